//! What each field takes: its shape, its range, its units. One list, from which entry checks, messages, forms and
//! random tests all follow.

use super::Choice::{self, *};
use super::LONGEST_TEXT;
use crate::quantity::{Kind, Unit};
use crate::working::{Field, Run, RunField};

/// The units in which a sheet is read and typed where no unit is given.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum UnitSystem {
    /// US customary units.
    Us,
    /// SI units.
    Si,
}

/// What a field takes.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Shape {
    /// Free text.
    Text {
        /// Characters at most.
        longest: usize,
    },
    /// A quantity; limits in SI.
    Measured {
        /// Its kind.
        kind: Kind,
        /// Least value.
        least: f64,
        /// Greatest value.
        most: f64,
    },
    /// A whole number.
    Count {
        /// Least value.
        least: u32,
        /// Greatest value.
        most: u32,
    },
    /// One of several answers.
    Choice(&'static [Choice]),
    /// Any of several answers.
    Choices(&'static [Choice]),
    /// A conductor size.
    Size,
}

/// Which kind of holder a field belongs to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Home {
    /// The sheet itself.
    Sheet,
    /// Each feeder.
    Feeder,
    /// Each other source of heat.
    Source,
}

/// The description of a field.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Spec {
    /// What it takes.
    pub shape: Shape,
    /// Its unit in US customary units; meaningful for measured shapes.
    pub us: Unit,
    /// Its unit in SI.
    pub si: Unit,
}

impl Spec {
    /// The unit in which the field is shown, and typed where no unit is given.
    pub fn unit(&self, system: UnitSystem) -> Unit {
        match system {
            UnitSystem::Us => self.us,
            UnitSystem::Si => self.si,
        }
    }
}

/// The parts of a run in the order in which they are asked for.
pub const MEASURES: [RunField; 11] = [
    RunField::Place,
    RunField::Length,
    RunField::Metal,
    RunField::Sets,
    RunField::Size,
    RunField::Ambient,
    RunField::Carrying,
    RunField::Insulation,
    RunField::Terminal,
    RunField::Conduit,
    RunField::PowerFactor,
];

/// The kind of holder which has `field`.
pub fn home(field: Field) -> Home {
    use Field::*;
    match field {
        Run(self::Run::Incoming, _) => Home::Sheet,
        Run(self::Run::Ahead | self::Run::Behind, _) => Home::Feeder,
        Tag
        | Load
        | Running
        | MotorPower
        | MotorCurrent
        | DriveInput
        | DriveLoss
        | HeatsinkShare
        | DriveChoke
        | DriveAmbientLimit
        | DriveAltitudeLimit
        | PermittedTypes
        | LargestPermitted
        | ShortCircuitRating
        | DeviceType
        | DeviceRating
        | DeviceLoss
        | ReactorPercent
        | ReactorReference
        | ReactorReferenceCurrent
        | ReactorLoss
        | FeederRemark => Home::Feeder,
        SourceName | SourceHeat | SourceOutput | SourceEfficiency | SourceCurrent
        | SourceRunning => Home::Source,
        _ => Home::Sheet,
    }
}

/// The fields of a kind of holder, in the order of the page.
pub fn fields_of(wanted: Home) -> Vec<Field> {
    let runs: &[Run] = match wanted {
        Home::Sheet => &[Run::Incoming],
        Home::Feeder => &[Run::Ahead, Run::Behind],
        Home::Source => &[],
    };
    let of_runs = runs
        .iter()
        .flat_map(|run| MEASURES.iter().map(|part| Field::Run(*run, *part)));
    Field::PLAIN
        .iter()
        .copied()
        .filter(|field| home(*field) == wanted)
        .chain(of_runs)
        .filter(|field| *field != Field::Run(Run::Incoming, RunField::Place))
        .collect()
}

const DEVICE_TYPES: &[Choice] = &[
    TimeDelayFuse,
    NontimeDelayFuse,
    ClassCcFuse,
    InverseTimeBreaker,
];

/// The description of `field`.
pub fn spec(field: Field) -> Spec {
    use Field as F;
    match field {
        F::SheetName => text(120),
        F::Job | F::Issue | F::PreparedBy | F::IssueDate => text(60),
        F::Remark | F::FeederRemark => text(LONGEST_TEXT),
        F::Tag => text(24),
        F::Load | F::SourceName => text(80),

        F::Basis => choice(&[Nec]),
        F::Edition => choice(&[Nec2023]),
        F::Units => choice(&[UsCustomary, Si]),
        F::ImpedanceKind => choice(&[Nameplate, MeasuredImpedance]),
        F::Capacitors | F::Surges => choice(&[No, Yes]),
        F::MainType => choice(&[InverseTimeBreaker, TimeDelayFuse, NontimeDelayFuse]),
        F::DeviceType => choice(DEVICE_TYPES),
        F::PermittedTypes => Spec {
            shape: Shape::Choices(DEVICE_TYPES),
            ..choice(&[])
        },
        F::EnclosureMaterial => choice(&[Painted, BareMetal, Plastic, DoubleWalled]),
        F::Mounting => choice(&[
            Free,
            AgainstWall,
            RowEnd,
            WallRowEnd,
            RowMiddle,
            WallRowMiddle,
            WallRowMiddleCovered,
        ]),
        F::Surroundings => choice(&[Indoors, Outdoors]),
        F::Cooling => choice(&[Sealed, FilterFans]),
        F::Running | F::SourceRunning => choice(&[Together, Standby]),
        F::ReactorReference => choice(&[OfDriveInput, OfMotorCurrent, OfOwnCurrent]),

        F::SupplyVoltage => measured(Kind::Voltage, 100.0, 1_000.0, Unit::Volt, Unit::Volt),
        F::SupplyFrequency => measured(Kind::Frequency, 40.0, 70.0, Unit::Hertz, Unit::Hertz),
        F::SourceFaultCurrent => current(100.0, 300_000.0, Unit::Kiloampere),
        F::ShortCircuitRating | F::MainShortCircuitRating => {
            current(100.0, 300_000.0, Unit::Kiloampere)
        }
        F::TransformerPower => measured(
            Kind::ApparentPower,
            1e3,
            1e8,
            Unit::KilovoltAmpere,
            Unit::KilovoltAmpere,
        ),
        F::TransformerImpedance => ratio(0.005, 0.20),
        F::VoltageUnbalance => ratio(0.0, 0.10),
        F::Altitude | F::DriveAltitudeLimit => {
            measured(Kind::Length, -430.0, 5_000.0, Unit::Foot, Unit::Metre)
        }
        F::RoomAmbient => temperature(-40.0, 70.0),
        F::InsideLimit => temperature(0.0, 90.0),
        F::DriveAmbientLimit => temperature(0.0, 80.0),
        F::MainRating => current(1.0, 6_000.0, Unit::Ampere),
        F::EnclosureHeight | F::EnclosureWidth | F::EnclosureDepth => {
            measured(Kind::Length, 0.05, 20.0, Unit::Inch, Unit::Millimetre)
        }
        F::WallCoefficient => measured(
            Kind::Transmittance,
            0.1,
            30.0,
            Unit::WattPerSquareMetreKelvin,
            Unit::WattPerSquareMetreKelvin,
        ),
        F::SunHeat | F::DriveLoss | F::SourceHeat => power(0.0, 200_000.0),
        F::DeviceLoss | F::MainLoss | F::ReactorLoss => power(0.0, 20_000.0),
        F::SourceOutput => power(1.0, 200_000.0),
        F::SourceEfficiency => ratio(0.3, 1.0),
        F::SourceCurrent => current(0.0, 6_000.0, Unit::Ampere),
        F::InstalledAirflow => measured(
            Kind::AirFlow,
            1.0 / 3600.0,
            30.0,
            Unit::CubicFootPerMinute,
            Unit::CubicMetrePerHour,
        ),
        F::MotorPower => measured(
            Kind::ShaftPower,
            10.0,
            1e6,
            Unit::Horsepower,
            Unit::Kilowatt,
        ),
        F::MotorCurrent | F::DriveInput => current(0.05, 3_000.0, Unit::Ampere),
        F::LargestPermitted | F::DeviceRating => current(0.5, 6_000.0, Unit::Ampere),
        F::ReactorReferenceCurrent => current(0.05, 3_000.0, Unit::Ampere),
        F::HeatsinkShare => ratio(0.0, 1.0),
        F::DriveChoke | F::ReactorPercent => ratio(0.0, 0.15),

        // The incoming run comes from outside: it has no other place to choose.
        F::Run(Run::Incoming, RunField::Place) => choice(&[Field]),
        F::Run(_, part) => of_run(part),
    }
}

fn of_run(part: RunField) -> Spec {
    match part {
        RunField::Place => choice(&[Inside, Field]),
        RunField::Length => measured(Kind::Length, 0.05, 5_000.0, Unit::Foot, Unit::Metre),
        RunField::Metal => choice(&[Copper, Aluminium]),
        RunField::Sets => count(1, 12),
        RunField::Size => Spec {
            shape: Shape::Size,
            ..choice(&[])
        },
        RunField::Ambient => temperature(-40.0, 90.0),
        RunField::Carrying => count(1, 120),
        RunField::Insulation => choice(&[Insulation60, Insulation75, Insulation90]),
        RunField::Terminal => choice(&[Unmarked, Marked60, Marked75]),
        RunField::Conduit => choice(&[SteelConduit, PvcConduit, AluminiumConduit]),
        RunField::PowerFactor => ratio(0.1, 1.0),
    }
}

const fn text(longest: usize) -> Spec {
    unmeasured(Shape::Text { longest })
}

const fn choice(offered: &'static [Choice]) -> Spec {
    unmeasured(Shape::Choice(offered))
}

const fn count(least: u32, most: u32) -> Spec {
    unmeasured(Shape::Count { least, most })
}

const fn unmeasured(shape: Shape) -> Spec {
    Spec {
        shape,
        us: Unit::One,
        si: Unit::One,
    }
}

const fn measured(kind: Kind, least: f64, most: f64, us: Unit, si: Unit) -> Spec {
    Spec {
        shape: Shape::Measured { kind, least, most },
        us,
        si,
    }
}

const fn current(least: f64, most: f64, unit: Unit) -> Spec {
    measured(Kind::Current, least, most, unit, unit)
}

const fn power(least: f64, most: f64) -> Spec {
    measured(Kind::Power, least, most, Unit::Watt, Unit::Watt)
}

const fn ratio(least: f64, most: f64) -> Spec {
    measured(Kind::Ratio, least, most, Unit::PerCent, Unit::PerCent)
}

const fn temperature(least_celsius: f64, most_celsius: f64) -> Spec {
    measured(
        Kind::Temperature,
        Unit::Celsius.to_si(least_celsius),
        Unit::Celsius.to_si(most_celsius),
        Unit::Fahrenheit,
        Unit::Celsius,
    )
}
