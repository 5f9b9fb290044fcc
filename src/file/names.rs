//! The names of the format: of fields, runs, choices, units and sizes.
//!
//! Each name is written out here, so that renaming a variant elsewhere cannot change a file. A name once shipped stays.

use crate::quantity::{Unit, WireSize};
use crate::sheet::{Choice, MEASURES};
use crate::working::{Field, Run, RunField};
use std::borrow::Cow;

/// The name of a field in a file: `motor_power`, `ahead.length`.
pub fn field_name(field: Field) -> Cow<'static, str> {
    let plain = match field {
        Field::SheetName => "sheet_name",
        Field::Job => "job",
        Field::Issue => "issue",
        Field::PreparedBy => "prepared_by",
        Field::IssueDate => "issue_date",
        Field::Remark => "remark",
        Field::Basis => "basis",
        Field::Edition => "edition",
        Field::Units => "units",
        Field::SupplyVoltage => "supply_voltage",
        Field::SupplyFrequency => "supply_frequency",
        Field::SourceFaultCurrent => "source_fault_current",
        Field::TransformerPower => "transformer_power",
        Field::TransformerImpedance => "transformer_impedance",
        Field::ImpedanceKind => "impedance_kind",
        Field::VoltageUnbalance => "voltage_unbalance",
        Field::Capacitors => "capacitors",
        Field::Surges => "surges",
        Field::Altitude => "altitude",
        Field::RoomAmbient => "room_ambient",
        Field::MainType => "main_type",
        Field::MainRating => "main_rating",
        Field::MainShortCircuitRating => "main_short_circuit_rating",
        Field::MainLoss => "main_loss",
        Field::EnclosureHeight => "enclosure_height",
        Field::EnclosureWidth => "enclosure_width",
        Field::EnclosureDepth => "enclosure_depth",
        Field::EnclosureMaterial => "enclosure_material",
        Field::WallCoefficient => "wall_coefficient",
        Field::Mounting => "mounting",
        Field::Surroundings => "surroundings",
        Field::SunHeat => "sun_heat",
        Field::Cooling => "cooling",
        Field::InsideLimit => "inside_limit",
        Field::InstalledAirflow => "installed_airflow",
        Field::Tag => "tag",
        Field::Load => "load",
        Field::Running => "running",
        Field::MotorPower => "motor_power",
        Field::MotorCurrent => "motor_current",
        Field::DriveInput => "drive_input",
        Field::DriveLoss => "drive_loss",
        Field::HeatsinkShare => "heatsink_share",
        Field::DriveChoke => "drive_choke",
        Field::DriveAmbientLimit => "drive_ambient_limit",
        Field::DriveAltitudeLimit => "drive_altitude_limit",
        Field::PermittedTypes => "permitted_types",
        Field::LargestPermitted => "largest_permitted",
        Field::ShortCircuitRating => "short_circuit_rating",
        Field::DeviceType => "device_type",
        Field::DeviceRating => "device_rating",
        Field::DeviceLoss => "device_loss",
        Field::ReactorPercent => "reactor_percent",
        Field::ReactorReference => "reactor_reference",
        Field::ReactorReferenceCurrent => "reactor_reference_current",
        Field::ReactorLoss => "reactor_loss",
        Field::FeederRemark => "feeder_remark",
        Field::SourceName => "source_name",
        Field::SourceHeat => "source_heat",
        Field::SourceOutput => "source_output",
        Field::SourceEfficiency => "source_efficiency",
        Field::SourceCurrent => "source_current",
        Field::SourceRunning => "source_running",
        Field::Run(run, part) => {
            return Cow::Owned(format!("{}.{}", run_name(run), part_name(part)));
        }
    };
    Cow::Borrowed(plain)
}

/// The field with this name.
pub(super) fn field_named(name: &str) -> Option<Field> {
    let Some((run, part)) = name.split_once('.') else {
        let named = |field: &&Field| field_name(**field) == name;
        return Field::PLAIN.iter().find(named).copied();
    };
    let run = [Run::Incoming, Run::Ahead, Run::Behind]
        .into_iter()
        .find(|known| run_name(*known) == run)?;
    let part = MEASURES
        .into_iter()
        .find(|known| part_name(*known) == part)?;
    Some(Field::Run(run, part))
}

/// The choice with this name.
pub(super) fn choice_named(name: &str) -> Option<Choice> {
    let named = |choice: &&Choice| choice_name(**choice) == name;
    Choice::ALL.iter().find(named).copied()
}

/// The unit with this name.
pub(super) fn unit_named(name: &str) -> Option<Unit> {
    Unit::ALL.into_iter().find(|unit| unit_name(*unit) == name)
}

/// The name of a run in a file.
fn run_name(run: Run) -> &'static str {
    match run {
        Run::Incoming => "incoming",
        Run::Ahead => "ahead",
        Run::Behind => "behind",
    }
}

/// The name of a part of a run in a file.
fn part_name(part: RunField) -> &'static str {
    match part {
        RunField::Place => "place",
        RunField::Length => "length",
        RunField::Metal => "metal",
        RunField::Sets => "sets",
        RunField::Size => "size",
        RunField::Ambient => "ambient",
        RunField::Carrying => "carrying",
        RunField::Insulation => "insulation",
        RunField::Terminal => "terminal",
        RunField::Conduit => "conduit",
        RunField::PowerFactor => "power_factor",
    }
}

/// The name of a choice in a file.
pub fn choice_name(choice: Choice) -> &'static str {
    match choice {
        Choice::Nec => "nec",
        Choice::Nec2023 => "nec_2023",
        Choice::UsCustomary => "us_customary",
        Choice::Si => "si",
        Choice::Nameplate => "nameplate",
        Choice::MeasuredImpedance => "measured_impedance",
        Choice::Yes => "yes",
        Choice::No => "no",
        Choice::Together => "together",
        Choice::Standby => "standby",
        Choice::Inside => "inside",
        Choice::Field => "field",
        Choice::Copper => "copper",
        Choice::Aluminium => "aluminium",
        Choice::SteelConduit => "steel_conduit",
        Choice::PvcConduit => "pvc_conduit",
        Choice::AluminiumConduit => "aluminium_conduit",
        Choice::Insulation60 => "insulation_60",
        Choice::Insulation75 => "insulation_75",
        Choice::Insulation90 => "insulation_90",
        Choice::Unmarked => "unmarked",
        Choice::Marked60 => "marked_60",
        Choice::Marked75 => "marked_75",
        Choice::TimeDelayFuse => "time_delay_fuse",
        Choice::NontimeDelayFuse => "nontime_delay_fuse",
        Choice::ClassCcFuse => "class_cc_fuse",
        Choice::InverseTimeBreaker => "inverse_time_breaker",
        Choice::Painted => "painted",
        Choice::BareMetal => "bare_metal",
        Choice::Plastic => "plastic",
        Choice::DoubleWalled => "double_walled",
        Choice::Free => "free",
        Choice::AgainstWall => "against_wall",
        Choice::RowEnd => "row_end",
        Choice::WallRowEnd => "wall_row_end",
        Choice::RowMiddle => "row_middle",
        Choice::WallRowMiddle => "wall_row_middle",
        Choice::WallRowMiddleCovered => "wall_row_middle_covered",
        Choice::Indoors => "indoors",
        Choice::Outdoors => "outdoors",
        Choice::Sealed => "sealed",
        Choice::FilterFans => "filter_fans",
        Choice::OfDriveInput => "of_drive_input",
        Choice::OfMotorCurrent => "of_motor_current",
        Choice::OfOwnCurrent => "of_own_current",
    }
}

/// The name of a unit in a file, in plain ASCII.
pub fn unit_name(unit: Unit) -> &'static str {
    match unit {
        Unit::Ampere => "A",
        Unit::Kiloampere => "kA",
        Unit::Volt => "V",
        Unit::Kilovolt => "kV",
        Unit::Watt => "W",
        Unit::Kilowatt => "kW",
        Unit::Horsepower => "hp",
        Unit::VoltAmpere => "VA",
        Unit::KilovoltAmpere => "kVA",
        Unit::MegavoltAmpere => "MVA",
        Unit::OhmPerKilometre => "ohm/km",
        Unit::OhmPerThousandFeet => "ohm/kft",
        Unit::Henry => "H",
        Unit::Millihenry => "mH",
        Unit::Microhenry => "uH",
        Unit::Hertz => "Hz",
        Unit::Metre => "m",
        Unit::Millimetre => "mm",
        Unit::Centimetre => "cm",
        Unit::Foot => "ft",
        Unit::Inch => "in",
        Unit::SquareMetre => "m2",
        Unit::SquareFoot => "ft2",
        Unit::SquareMillimetre => "mm2",
        Unit::CircularMil => "cmil",
        Unit::ThousandCircularMils => "kcmil",
        Unit::Celsius => "degC",
        Unit::Fahrenheit => "degF",
        Unit::Kelvin => "K",
        Unit::KelvinDifference => "delta K",
        Unit::FahrenheitDifference => "delta degF",
        Unit::WattPerSquareMetreKelvin => "W/(m2 K)",
        Unit::WattPerKelvin => "W/K",
        Unit::Pascal => "Pa",
        Unit::Kilopascal => "kPa",
        Unit::KilogramPerCubicMetre => "kg/m3",
        Unit::JoulePerKilogramKelvin => "J/(kg K)",
        Unit::CubicMetrePerSecond => "m3/s",
        Unit::CubicMetrePerHour => "m3/h",
        Unit::CubicFootPerMinute => "cfm",
        Unit::MetrePerOhm => "m/ohm",
        Unit::FootPerOhm => "ft/ohm",
        Unit::One => "1",
        Unit::PerCent => "%",
    }
}

/// The name of a conductor size in a file: gauge number below 250, thousands of circular mils from there.
pub fn size_name(size: WireSize) -> &'static str {
    match size {
        WireSize::Awg18 => "18",
        WireSize::Awg16 => "16",
        WireSize::Awg14 => "14",
        WireSize::Awg12 => "12",
        WireSize::Awg10 => "10",
        WireSize::Awg8 => "8",
        WireSize::Awg6 => "6",
        WireSize::Awg4 => "4",
        WireSize::Awg3 => "3",
        WireSize::Awg2 => "2",
        WireSize::Awg1 => "1",
        WireSize::Awg1Over0 => "1/0",
        WireSize::Awg2Over0 => "2/0",
        WireSize::Awg3Over0 => "3/0",
        WireSize::Awg4Over0 => "4/0",
        WireSize::Kcmil250 => "250",
        WireSize::Kcmil300 => "300",
        WireSize::Kcmil350 => "350",
        WireSize::Kcmil400 => "400",
        WireSize::Kcmil500 => "500",
        WireSize::Kcmil600 => "600",
        WireSize::Kcmil700 => "700",
        WireSize::Kcmil750 => "750",
        WireSize::Kcmil800 => "800",
        WireSize::Kcmil900 => "900",
        WireSize::Kcmil1000 => "1000",
        WireSize::Kcmil1250 => "1250",
        WireSize::Kcmil1500 => "1500",
        WireSize::Kcmil1750 => "1750",
        WireSize::Kcmil2000 => "2000",
    }
}

/// The size with this name.
pub(super) fn size_named(name: &str) -> Option<WireSize> {
    WireSize::ALL
        .into_iter()
        .find(|size| size_name(*size) == name)
}
