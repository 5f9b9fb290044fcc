//! Findings for the margin, and the cautions, as data. `words` makes the sentences.

use super::{Field, Figure, Holder, Place, Run};
use crate::quantity::{
    AirFlow, Current, Length, Ratio, ShaftPower, Temperature, Voltage, WireSize,
};
use std::sync::Arc;

/// How much a finding weighs. Ordered with the gravest first.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Grade {
    /// Outside a limit: not to be built as entered.
    Stop,
    /// Needs an answer before review.
    Query,
    /// Worth knowing.
    Note,
}

/// A published table some cells of which are known only from memory.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum MemoryTable {
    /// UL 508A Table 28.1.
    InsideAmpacity,
    /// NEC Table 310.16, cells from memory.
    FieldAmpacity,
    /// Point-to-point C constants, cells from memory.
    FaultConstants,
    /// Largest loss of breakers for each pole.
    BreakerLoss,
    /// Largest loss of fuse links.
    FuseLoss,
}

/// A reason of practice to ask for an input reactor.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum ReactorReason {
    /// The source is at least ten times the drive, and 500 kVA or more.
    SourcePower,
    /// The source impedance on the drive's base is under one per cent.
    SourceImpedance,
    /// The line voltages differ too much.
    Unbalance,
    /// Switched capacitors on the bus.
    Capacitors,
    /// A supply prone to surges.
    Surges,
}

/// What a finding says. Fields carry what its sentence needs.
#[derive(Debug, Clone, PartialEq)]
#[allow(
    missing_docs,
    reason = "the fields are named as their quantities; each variant says what it means"
)]
pub enum NoteKind {
    /// Something typed was refused and is kept beside its field.
    DraftRefused { text: String },
    /// Two feeders carry one tag.
    TagRepeated { tag: String },
    /// The feeder drives nothing yet: nothing is sized.
    NoLoad,
    /// No motor voltage of Table 430.250 serves this supply.
    SupplyVoltageUnserved { voltage: Voltage },
    /// The table has no motor of this power at this voltage.
    MotorNotInTable { power: ShaftPower },
    /// The motor's power lies between two rows; the next row up is taken.
    MotorBetweenRows { power: ShaftPower, row: ShaftPower },
    /// The drive's rated input current is assumed.
    DriveInputAssumed { assumed: Current },
    /// The drive's rated input current could not even be assumed.
    DriveInputUnknown,
    /// The drive takes less than its motor: is it the right drive?
    DriveSmallerThanMotor { input: Current, motor: Current },
    /// No size carries the current.
    NoConductorFits {
        run: Run,
        needed: Current,
        carries: Current,
        largest: WireSize,
    },
    /// The air of the route is hotter than the insulation's column allows.
    AmbientBeyondInsulation { run: Run, ambient: Temperature },
    /// Aluminium inside the enclosure: Table 28.1 has none.
    AluminiumInside { run: Run },
    /// The table has no cell in the terminals' column for conductors in parallel.
    NoCellInColumn { run: Run, column: Temperature },
    /// The length of a run is missing: no drop is worked.
    LengthMissing { run: Run },
    /// Without a transformer it is open whether the source asks for reactors.
    SourceUnknown,
    /// The size entered is smaller than the rules ask for.
    ConductorTooSmall {
        run: Run,
        entered: WireSize,
        smallest: WireSize,
    },
    /// Sets in parallel below 1/0 AWG.
    ParallelTooSmall { run: Run, entered: WireSize },
    /// The size entered stands in no row of the ampacity table.
    SizeNotInTable { run: Run, entered: WireSize },
    /// Testing the corrected column at 100 % would give a smaller size.
    SizeAtHundredPerCent {
        run: Run,
        size: WireSize,
        taken: WireSize,
    },
    /// The hot air inside decided the size.
    InsideAirDecides { run: Run, air: Temperature },
    /// The drive's instructions do not list the type of the device.
    DeviceTypeNotPermitted { by_rule: Current },
    /// The drive's largest device is no standard rating; the next below is taken.
    LimitNotStandard { limit: Current, taken: Current },
    /// No standard rating lies at or below the drive's largest device.
    LimitBelowStandard { limit: Current },
    /// The drive's instructions hold the rating below what the rule permits.
    DeviceHeldByDrive { by_rule: Current, taken: Current },
    /// Class CC ends below what the rule permits.
    ClassCcEnds { by_rule: Current, taken: Current },
    /// Class CC ends below 125 % of the current.
    ClassCcTooSmall { needed: Current },
    /// No standard rating reaches the product.
    DeviceBeyondTable { product: Current },
    /// The rating entered is above what rule and drive permit.
    DeviceAboveMaximum { entered: Current, largest: Current },
    /// The rating entered is no standard rating.
    DeviceNotStandard { entered: Current },
    /// The device is rated below the drive's input current.
    DeviceBelowInput { rating: Current, input: Current },
    /// Table 9 has no impedance for this size: no drop is worked.
    DropUnknown { run: Run, size: WireSize },
    /// The drop of the feeder is above what is advised.
    DropAboveAdvice { drop: Ratio, advised: Ratio },
    /// The grounding conductor is held to the size of its phase conductors.
    GroundingCapped { run: Run, size: WireSize },
    /// No row of Table 250.122 reaches the device.
    GroundingBeyondTable { rating: Current },
    /// Practice asks for an input reactor.
    ReactorAdvised {
        percent: Ratio,
        reasons: Vec<ReactorReason>,
    },
    /// The entered reactor is smaller than the one practice asks for.
    ReactorBelowAdvice {
        entered: Ratio,
        advised: Ratio,
        reasons: Vec<ReactorReason>,
    },
    /// Several drives share the bus.
    SeveralDrives { drives: u32 },
    /// The current to which the reactor's percentage refers is missing.
    ReactorReferenceMissing,
    /// The drive stands in air hotter than its full current allows.
    DriveTooHot {
        air: Temperature,
        limit: Temperature,
    },
    /// The drive stands higher than its full current allows.
    DriveTooHigh { altitude: Length, limit: Length },
    /// The loss of this device could not be assumed.
    DeviceLossUnknown { rating: Current },
    /// A heat source without heat.
    SourceHeatUnknown,
    /// Cells known only from memory took part.
    TableFromMemory {
        table: MemoryTable,
        rows: Vec<String>,
    },
    /// These feeders stand by.
    StandingBy { tags: Vec<String> },
    /// The transformer's impedance is assumed: a lower one lets more current through.
    ImpedanceAssumed { assumed: Ratio },
    /// The supply voltage is missing: nothing can be sized.
    SupplyVoltageMissing,
    /// These stand by, and ask for more than what runs: the incoming circuit does not hold for them.
    StandbyLarger { tags: Vec<String> },
    /// The sealed rise is by a rule which stands for 30 K at sea level: near the limit that decides.
    WallRuleNearLimit {
        inside: Temperature,
        limit: Temperature,
    },
    /// Other loads are counted at their current: heaters would take 125 per cent.
    OtherLoadsAtCurrent { names: Vec<String> },
    /// Transformer or voltage is missing: no fault current.
    FaultCurrentUnknown,
    /// The incoming run is missing: the fault current is that at its start.
    FaultRunUnknown,
    /// The C constant of this size is missing.
    FaultConstantMissing { size: WireSize },
    /// The panel can meet more than its lowest rating.
    FaultAboveRating {
        fault: Current,
        rating: Current,
        lowest: Vec<String>,
    },
    /// Parts without an entered short-circuit rating.
    RatingMissing { tags: Vec<String>, main_too: bool },
    /// No branch device could be worked for the type of the main device.
    NoBranchForMain,
    /// A reactor's loss is entered, but no reactor.
    ReactorLossUnused,
    /// No standard rating lies at or below the sum.
    NoMainFits { sum: Current },
    /// The main device, rounded down, is below the running current.
    MainBelowRunning { rating: Current, running: Current },
    /// The rating entered for the main is above the largest permitted.
    MainAboveMaximum { entered: Current, largest: Current },
    /// Feeders without a worked device are missing in the sum of the main.
    MainIncomplete { tags: Vec<String> },
    /// The enclosure's measures are missing.
    EnclosureUnknown,
    /// Outdoors without an entered heat of the sun.
    SunMissing,
    /// The sealed enclosure gets hotter than allowed.
    InsideAboveLimit {
        inside: Temperature,
        limit: Temperature,
    },
    /// The inside is not warmer than the air which is to cool it.
    InsideNotWarmer {
        limit: Temperature,
        ambient: Temperature,
    },
    /// The fans move less than is needed.
    AirflowShort { installed: AirFlow, needed: AirFlow },
    /// Nothing says how much the fans really move.
    AirflowUnknown { needed: AirFlow },
    /// Some heat is missing in the ledger.
    LedgerIncomplete { tags: Vec<String> },
    /// The loop between air and sizes has no exact solution: the warmer end is kept.
    LoopKeptWarmerEnd { air: Temperature },
}

impl NoteKind {
    /// A short name of the finding, unique and stable: answers are kept under it.
    pub const fn id(&self) -> &'static str {
        match self {
            NoteKind::DraftRefused { .. } => "draft-refused",
            NoteKind::TagRepeated { .. } => "tag-repeated",
            NoteKind::NoLoad => "no-load",
            NoteKind::SupplyVoltageUnserved { .. } => "supply-voltage-unserved",
            NoteKind::MotorNotInTable { .. } => "motor-not-in-table",
            NoteKind::MotorBetweenRows { .. } => "motor-between-rows",
            NoteKind::DriveInputAssumed { .. } => "drive-input-assumed",
            NoteKind::DriveInputUnknown => "drive-input-unknown",
            NoteKind::DriveSmallerThanMotor { .. } => "drive-smaller-than-motor",
            NoteKind::NoConductorFits { .. } => "no-conductor-fits",
            NoteKind::AmbientBeyondInsulation { .. } => "ambient-beyond-insulation",
            NoteKind::AluminiumInside { .. } => "aluminium-inside",
            NoteKind::NoCellInColumn { .. } => "no-cell-in-column",
            NoteKind::LengthMissing { .. } => "length-missing",
            NoteKind::SourceUnknown => "source-unknown",
            NoteKind::ConductorTooSmall { .. } => "conductor-too-small",
            NoteKind::ParallelTooSmall { .. } => "parallel-too-small",
            NoteKind::SizeNotInTable { .. } => "size-not-in-table",
            NoteKind::SizeAtHundredPerCent { .. } => "size-at-hundred-per-cent",
            NoteKind::InsideAirDecides { .. } => "inside-air-decides",
            NoteKind::DeviceTypeNotPermitted { .. } => "device-type-not-permitted",
            NoteKind::LimitNotStandard { .. } => "limit-not-standard",
            NoteKind::LimitBelowStandard { .. } => "limit-below-standard",
            NoteKind::DeviceHeldByDrive { .. } => "device-held-by-drive",
            NoteKind::ClassCcEnds { .. } => "class-cc-ends",
            NoteKind::ClassCcTooSmall { .. } => "class-cc-too-small",
            NoteKind::DeviceBeyondTable { .. } => "device-beyond-table",
            NoteKind::DeviceAboveMaximum { .. } => "device-above-maximum",
            NoteKind::DeviceNotStandard { .. } => "device-not-standard",
            NoteKind::DeviceBelowInput { .. } => "device-below-input",
            NoteKind::DropUnknown { .. } => "drop-unknown",
            NoteKind::DropAboveAdvice { .. } => "drop-above-advice",
            NoteKind::GroundingCapped { .. } => "grounding-capped",
            NoteKind::GroundingBeyondTable { .. } => "grounding-beyond-table",
            NoteKind::ReactorAdvised { .. } => "reactor-advised",
            NoteKind::ReactorBelowAdvice { .. } => "reactor-below-advice",
            NoteKind::SeveralDrives { .. } => "several-drives",
            NoteKind::ReactorReferenceMissing => "reactor-reference-missing",
            NoteKind::DriveTooHot { .. } => "drive-too-hot",
            NoteKind::DriveTooHigh { .. } => "drive-too-high",
            NoteKind::DeviceLossUnknown { .. } => "device-loss-unknown",
            NoteKind::SourceHeatUnknown => "source-heat-unknown",
            NoteKind::TableFromMemory { table, .. } => match table {
                MemoryTable::InsideAmpacity => "inside-ampacity-from-memory",
                MemoryTable::FieldAmpacity => "field-ampacity-from-memory",
                MemoryTable::FaultConstants => "fault-constants-from-memory",
                MemoryTable::BreakerLoss => "breaker-loss-from-memory",
                MemoryTable::FuseLoss => "fuse-loss-from-memory",
            },
            NoteKind::StandingBy { .. } => "standing-by",
            NoteKind::ImpedanceAssumed { .. } => "impedance-assumed",
            NoteKind::SupplyVoltageMissing => "supply-voltage-missing",
            NoteKind::StandbyLarger { .. } => "standby-larger",
            NoteKind::WallRuleNearLimit { .. } => "wall-rule-near-limit",
            NoteKind::OtherLoadsAtCurrent { .. } => "other-loads-at-current",
            NoteKind::FaultCurrentUnknown => "fault-current-unknown",
            NoteKind::FaultRunUnknown => "fault-run-unknown",
            NoteKind::FaultConstantMissing { .. } => "fault-constant-missing",
            NoteKind::FaultAboveRating { .. } => "fault-above-rating",
            NoteKind::RatingMissing { .. } => "rating-missing",
            NoteKind::NoBranchForMain => "no-branch-for-main",
            NoteKind::ReactorLossUnused => "reactor-loss-unused",
            NoteKind::NoMainFits { .. } => "no-main-fits",
            NoteKind::MainBelowRunning { .. } => "main-below-running",
            NoteKind::MainAboveMaximum { .. } => "main-above-maximum",
            NoteKind::MainIncomplete { .. } => "main-incomplete",
            NoteKind::EnclosureUnknown => "enclosure-unknown",
            NoteKind::SunMissing => "sun-missing",
            NoteKind::InsideAboveLimit { .. } => "inside-above-limit",
            NoteKind::InsideNotWarmer { .. } => "inside-not-warmer",
            NoteKind::AirflowShort { .. } => "airflow-short",
            NoteKind::AirflowUnknown { .. } => "airflow-unknown",
            NoteKind::LedgerIncomplete { .. } => "ledger-incomplete",
            NoteKind::LoopKeptWarmerEnd { .. } => "loop-kept-warmer-end",
        }
    }
}

/// A finding at a place of the sheet.
#[derive(Debug, Clone, PartialEq)]
pub struct MarginNote {
    /// What it says.
    pub kind: NoteKind,
    /// How much it weighs.
    pub grade: Grade,
    /// What it is about.
    pub place: Place,
    /// The figures concerned.
    pub figures: Vec<Arc<Figure>>,
}

impl MarginNote {
    /// A note at a field of the sheet itself; [`MarginNote::held_by`] moves it to a feeder.
    pub fn new(grade: Grade, field: Field, kind: NoteKind) -> Self {
        Self {
            kind,
            grade,
            place: Place {
                holder: Holder::Sheet,
                field,
            },
            figures: Vec::new(),
        }
    }

    /// The same note with a figure it is about.
    pub fn about(mut self, figure: &Arc<Figure>) -> Self {
        self.figures.push(Arc::clone(figure));
        self
    }

    /// The same note at `holder`.
    pub fn held_by(mut self, holder: Holder) -> Self {
        self.place.holder = holder;
        self
    }
}

/// A fixed safety statement: never computed, never dismissed, always printed.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Caution {
    /// Local code, its authority and licensed review decide.
    LocalCodeDecides,
    /// Drive capacitors stay charged after isolation.
    StoredCharge,
    /// The makers' instructions stand above this sheet.
    InstructionsGovern,
    /// Fault currents need the utility's own figures and an arc-flash study.
    FaultAndArcFlash,
    /// Values from memory and assumptions must be confirmed.
    ConfirmAssumptions,
}

impl Caution {
    /// All cautions, in the order in which they are shown.
    pub const ALL: [Caution; 5] = [
        Caution::LocalCodeDecides,
        Caution::StoredCharge,
        Caution::InstructionsGovern,
        Caution::FaultAndArcFlash,
        Caution::ConfirmAssumptions,
    ];
}
