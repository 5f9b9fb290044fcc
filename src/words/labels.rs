//! Names of fields, runs, choices, groups, totals, verdicts, grades and inks.

use crate::sheet::Choice;
use crate::work::{LedgerGroup, TotalKind, Verdict};
use crate::working::{Field, Grade, Ink, Known, Run, RunField};

/// The label of a field of a run in two: the run, and what is said of it.
pub fn label_in_run(field: Field) -> Option<(&'static str, &'static str)> {
    match field {
        Field::Run(..) => label(field).split_once(", "),
        _ => None,
    }
}

/// The name of a field in a form, in a refusal, in the list of assumptions.
pub const fn label(field: Field) -> &'static str {
    match field {
        Field::SheetName => "Sheet",
        Field::Job => "Job",
        Field::Issue => "Issue",
        Field::PreparedBy => "Prepared by",
        Field::IssueDate => "Date of issue",
        Field::Remark => "Remark on the sheet",
        Field::Basis => "Basis",
        Field::Edition => "Edition",
        Field::Units => "Units",
        Field::SupplyVoltage => "Supply voltage, line to line",
        Field::SupplyFrequency => "Supply frequency",
        Field::SourceFaultCurrent => "Fault current at the start of the incoming run",
        Field::TransformerPower => "Transformer power",
        Field::TransformerImpedance => "Transformer impedance",
        Field::ImpedanceKind => "The impedance is",
        Field::VoltageUnbalance => "Voltage unbalance at the panel",
        Field::Capacitors => "Switched power-factor capacitors on the bus",
        Field::Surges => "Supply prone to surges",
        Field::Altitude => "Height above sea level",
        Field::RoomAmbient => "Warmest air around the enclosure",
        Field::MainType => "Main device",
        Field::MainRating => "Rating of the main device",
        Field::MainShortCircuitRating => "Short-circuit current rating of the main device",
        Field::MainLoss => "Loss of the main device",
        Field::EnclosureHeight => "Enclosure height, outside",
        Field::EnclosureWidth => "Enclosure width, outside",
        Field::EnclosureDepth => "Enclosure depth, outside",
        Field::EnclosureMaterial => "Walls",
        Field::WallCoefficient => "Wall coefficient",
        Field::Mounting => "Mounting",
        Field::Surroundings => "Indoors or outdoors",
        Field::SunHeat => "Heat of the sun taken up",
        Field::Cooling => "Cooling",
        Field::InsideLimit => "Warmest air allowed inside",
        Field::InstalledAirflow => "Airflow of the fans against their filters",
        Field::Tag => "Tag",
        Field::Load => "What is driven",
        Field::Running => "Runs together or stands by",
        Field::MotorPower => "Motor power",
        Field::MotorCurrent => "Motor full-load current",
        Field::DriveInput => "Drive rated input current",
        Field::DriveLoss => "Drive loss at full load",
        Field::HeatsinkShare => "Share of the loss carried outside by the heatsink",
        Field::DriveChoke => "Choke built into the drive",
        Field::DriveAmbientLimit => "Warmest air at full drive current",
        Field::DriveAltitudeLimit => "Greatest height at full drive current",
        Field::PermittedTypes => "Device types the drive permits",
        Field::LargestPermitted => "Largest device the drive permits",
        Field::ShortCircuitRating => "Short-circuit current rating of drive with device",
        Field::DeviceType => "Branch device",
        Field::DeviceRating => "Rating of the branch device",
        Field::DeviceLoss => "Loss of the branch device",
        Field::ReactorPercent => "Input reactor",
        Field::ReactorReference => "The reactor's percentage is of",
        Field::ReactorReferenceCurrent => "Current of the reactor's percentage",
        Field::ReactorLoss => "Loss of the input reactor",
        Field::FeederRemark => "Remark on the feeder",
        Field::SourceName => "Source of heat",
        Field::SourceHeat => "Heat of the source",
        Field::SourceOutput => "Output of the control supply",
        Field::SourceEfficiency => "Efficiency of the control supply",
        Field::SourceCurrent => "Current of the source",
        Field::SourceRunning => "Source runs together or stands by",
        Field::Run(Run::Incoming, part) => match part {
            RunField::Place => "Incoming run, where it lies",
            RunField::Length => "Incoming run, length one way",
            RunField::Metal => "Incoming run, metal",
            RunField::Sets => "Incoming run, conductors in parallel",
            RunField::Size => "Incoming run, size to be installed",
            RunField::Ambient => "Incoming run, warmest air",
            RunField::Carrying => "Incoming run, current-carrying conductors",
            RunField::Insulation => "Incoming run, insulation",
            RunField::Terminal => "Incoming run, terminals",
            RunField::Conduit => "Incoming run, raceway",
            RunField::PowerFactor => "Incoming run, power factor",
        },
        Field::Run(Run::Ahead, part) => match part {
            RunField::Place => "Ahead of the drive, where the run lies",
            RunField::Length => "Ahead of the drive, length one way",
            RunField::Metal => "Ahead of the drive, metal",
            RunField::Sets => "Ahead of the drive, conductors in parallel",
            RunField::Size => "Ahead of the drive, size to be installed",
            RunField::Ambient => "Ahead of the drive, warmest air",
            RunField::Carrying => "Ahead of the drive, current-carrying conductors",
            RunField::Insulation => "Ahead of the drive, insulation",
            RunField::Terminal => "Ahead of the drive, terminals",
            RunField::Conduit => "Ahead of the drive, raceway",
            RunField::PowerFactor => "Ahead of the drive, power factor",
        },
        Field::Run(Run::Behind, part) => match part {
            RunField::Place => "Behind the drive, where the run lies",
            RunField::Length => "Behind the drive, length one way",
            RunField::Metal => "Behind the drive, metal",
            RunField::Sets => "Behind the drive, conductors in parallel",
            RunField::Size => "Behind the drive, size to be installed",
            RunField::Ambient => "Behind the drive, warmest air",
            RunField::Carrying => "Behind the drive, current-carrying conductors",
            RunField::Insulation => "Behind the drive, insulation",
            RunField::Terminal => "Behind the drive, terminals",
            RunField::Conduit => "Behind the drive, raceway",
            RunField::PowerFactor => "Behind the drive, power factor",
        },
    }
}

/// The short name of a field, for the head of a column. Columns of runs stand under the name of their run.
pub const fn head(field: Field) -> &'static str {
    match field {
        Field::SheetName => "Sheet",
        Field::Job => "Job",
        Field::Issue => "Issue",
        Field::PreparedBy => "Prepared by",
        Field::IssueDate => "Date",
        Field::Remark | Field::FeederRemark => "Remark",
        Field::Basis => "Basis",
        Field::Edition => "Edition",
        Field::Units => "Units",
        Field::SupplyVoltage => "Voltage",
        Field::SupplyFrequency => "Frequency",
        Field::SourceFaultCurrent => "Fault current",
        Field::TransformerPower => "Transformer",
        Field::TransformerImpedance => "Impedance",
        Field::ImpedanceKind => "Impedance by",
        Field::VoltageUnbalance => "Unbalance",
        Field::Capacitors => "Capacitors",
        Field::Surges => "Surges",
        Field::Altitude => "Height",
        Field::RoomAmbient => "Room",
        Field::MainType => "Main device",
        Field::MainRating => "Main rating",
        Field::MainShortCircuitRating | Field::ShortCircuitRating => "SCCR",
        Field::EnclosureHeight => "High",
        Field::EnclosureWidth => "Wide",
        Field::EnclosureDepth => "Deep",
        Field::EnclosureMaterial => "Walls",
        Field::WallCoefficient => "Wall coefficient",
        Field::Mounting => "Mounting",
        Field::Surroundings => "Where",
        Field::SunHeat => "Sun",
        Field::Cooling => "Cooling",
        Field::InsideLimit => "Limit inside",
        Field::InstalledAirflow => "Fans move",
        Field::Tag => "Tag",
        Field::Load => "Load",
        Field::Running | Field::SourceRunning => "Duty",
        Field::MotorPower => "Motor",
        Field::MotorCurrent => "Motor current",
        Field::DriveInput => "Drive input",
        Field::DriveLoss => "Drive loss",
        Field::HeatsinkShare => "Heat outside",
        Field::DriveChoke => "Choke",
        Field::DriveAmbientLimit => "Drive air limit",
        Field::DriveAltitudeLimit => "Drive height limit",
        Field::PermittedTypes => "Permitted types",
        Field::LargestPermitted => "Drive's largest",
        Field::DeviceType => "Device",
        Field::DeviceRating => "Rating",
        Field::DeviceLoss => "Device loss",
        Field::MainLoss => "Main loss",
        Field::ReactorPercent => "Reactor",
        Field::ReactorReference => "Reactor % of",
        Field::ReactorReferenceCurrent => "Reactor base",
        Field::ReactorLoss => "Reactor loss",
        Field::SourceName => "Source",
        Field::SourceHeat => "Heat",
        Field::SourceOutput => "Output",
        Field::SourceEfficiency => "Efficiency",
        Field::SourceCurrent => "Current",
        Field::Run(_, part) => match part {
            RunField::Place => "Lies",
            RunField::Length => "Run",
            RunField::Metal => "Metal",
            RunField::Sets => "Sets",
            RunField::Size => "Size",
            RunField::Ambient => "Air",
            RunField::Carrying => "Carrying",
            RunField::Insulation => "Insulation",
            RunField::Terminal => "Terminals",
            RunField::Conduit => "Raceway",
            RunField::PowerFactor => "Power factor",
        },
    }
}

/// A run, as part of a sentence or as the heading of its group.
pub const fn run(run: Run) -> &'static str {
    match run {
        Run::Incoming => "incoming conductors",
        Run::Ahead => "conductors ahead of the drive",
        Run::Behind => "conductors behind the drive",
    }
}

/// Where a run is, behind the name of something which belongs to it.
pub const fn run_where(run: Run) -> &'static str {
    match run {
        Run::Incoming => "of the incoming run",
        Run::Ahead => "ahead of the drive",
        Run::Behind => "behind the drive",
    }
}

/// A field of a run, under the heading of its run.
pub const fn run_field(part: RunField) -> &'static str {
    match part {
        RunField::Place => "Where it lies",
        RunField::Length => "Length one way",
        RunField::Metal => "Metal",
        RunField::Sets => "Conductors in parallel",
        RunField::Size => "Size to be installed",
        RunField::Ambient => "Warmest air along it",
        RunField::Carrying => "Current-carrying conductors",
        RunField::Insulation => "Insulation",
        RunField::Terminal => "Terminals",
        RunField::Conduit => "Raceway",
        RunField::PowerFactor => "Power factor",
    }
}

/// One answer of a field which offers a choice.
pub const fn choice(choice: Choice) -> &'static str {
    match choice {
        Choice::Nec => "NEC",
        Choice::Nec2023 => "2023",
        Choice::UsCustomary => "US",
        Choice::Si => "SI",
        Choice::Nameplate => "from the nameplate",
        Choice::MeasuredImpedance => "measured",
        Choice::Yes => "yes",
        Choice::No => "no",
        Choice::Together => "runs together",
        Choice::Standby => "stands by",
        Choice::Inside => "inside the enclosure",
        Choice::Field => "in the field",
        Choice::Copper => "copper",
        Choice::Aluminium => "aluminium",
        Choice::SteelConduit => "steel conduit",
        Choice::PvcConduit => "PVC conduit",
        Choice::AluminiumConduit => "aluminium conduit",
        Choice::Insulation60 => "60 °C insulation",
        Choice::Insulation75 => "75 °C insulation",
        Choice::Insulation90 => "90 °C insulation",
        Choice::Unmarked => "unmarked",
        Choice::Marked60 => "marked 60 °C",
        Choice::Marked75 => "marked 75 °C",
        Choice::TimeDelayFuse => "time-delay fuse",
        Choice::NontimeDelayFuse => "nontime-delay fuse",
        Choice::ClassCcFuse => "Class CC fuse",
        Choice::InverseTimeBreaker => "inverse time breaker",
        Choice::Painted => "painted or coated sheet",
        Choice::BareMetal => "bare stainless steel or aluminium",
        Choice::Plastic => "plastic",
        Choice::DoubleWalled => "double-walled",
        Choice::Free => "alone, free on all sides",
        Choice::AgainstWall => "alone, against a wall",
        Choice::RowEnd => "at the end of a free-standing row",
        Choice::WallRowEnd => "at the end of a row against a wall",
        Choice::RowMiddle => "within a free-standing row",
        Choice::WallRowMiddle => "within a row against a wall",
        Choice::WallRowMiddleCovered => "within a row against a wall, top covered",
        Choice::Indoors => "indoors",
        Choice::Outdoors => "outdoors",
        Choice::Sealed => "sealed",
        Choice::FilterFans => "filter fans",
        Choice::OfDriveInput => "the drive's rated input current",
        Choice::OfMotorCurrent => "the motor's full-load current",
        Choice::OfOwnCurrent => "a current of its own",
    }
}

/// A group of the heat ledger.
pub const fn ledger_group(group: LedgerGroup) -> &'static str {
    match group {
        LedgerGroup::Drives => "Drives",
        LedgerGroup::Reactors => "Input reactors",
        LedgerGroup::Devices => "Protective devices",
        LedgerGroup::Conductors => "Conductors inside",
        LedgerGroup::Others => "Control supplies and others",
        LedgerGroup::Sun => "Sun",
    }
}

/// A total at the head of the margin.
pub const fn total(kind: TotalKind) -> &'static str {
    match kind {
        TotalKind::Heat => "Heat inside",
        TotalKind::InsideTemperature => "Air inside",
        TotalKind::Airflow => "Air to move",
        TotalKind::IncomingCurrent => "Incoming current",
        TotalKind::MainDevice => "Main device",
        TotalKind::FaultCurrent => "Fault current",
    }
}

/// What the limit of a total is; its value follows.
pub const fn limit(kind: TotalKind) -> &'static str {
    match kind {
        TotalKind::Heat => "limit",
        TotalKind::InsideTemperature => "limit",
        TotalKind::Airflow => "fans move",
        TotalKind::IncomingCurrent => "conductors carry",
        TotalKind::MainDevice => "at most",
        TotalKind::FaultCurrent => "lowest rating",
    }
}

/// The verdict on a total.
pub const fn verdict(verdict: Verdict) -> &'static str {
    match verdict {
        Verdict::Within => "within",
        Verdict::Beyond => "beyond",
        Verdict::Unknown => "open",
        Verdict::NoLimit => "no limit",
    }
}

/// The grade of a margin note.
pub const fn grade(grade: Grade) -> &'static str {
    match grade {
        Grade::Stop => "stop",
        Grade::Query => "query",
        Grade::Note => "note",
    }
}

/// What the grade of a margin note means.
pub const fn grade_meaning(grade: Grade) -> &'static str {
    match grade {
        Grade::Stop => "outside a limit: not to be built as entered",
        Grade::Query => "needs an answer before review",
        Grade::Note => "worth knowing",
    }
}

/// Where a value comes from.
pub const fn ink(ink: Ink) -> &'static str {
    match ink {
        Ink::Entered => "entered",
        Ink::Assumed => "assumed",
        Ink::Worked => "worked",
    }
}

/// How well a rule or a table is known, to be said behind its source; empty where nothing needs to be said.
pub const fn known(known: Known) -> &'static str {
    match known {
        Known::Derived | Known::CrossChecked | Known::Read => "",
        Known::CommonPractice => "common practice, no published source",
        Known::FromMemory => "from memory: confirm",
    }
}

/// Several answers in a row, parted by `between`.
pub fn answers<'a>(several: impl IntoIterator<Item = &'a Choice>, between: &str) -> String {
    several
        .into_iter()
        .map(|answer| choice(*answer))
        .collect::<Vec<_>>()
        .join(between)
}

/// `text` with a small first letter, unless its first word is an abbreviation.
pub fn lower_first(text: &str) -> String {
    let mut letters = text.chars();
    match (letters.next(), letters.clone().next()) {
        (Some(first), Some(second)) if !second.is_uppercase() => {
            first.to_lowercase().chain(letters).collect()
        }
        _ => text.to_owned(),
    }
}

/// `text` with a capital first letter.
pub fn upper_first(text: &str) -> String {
    let mut letters = text.chars();
    letters.next().map_or_else(String::new, |first| {
        first.to_uppercase().chain(letters).collect()
    })
}
