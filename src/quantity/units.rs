//! The units in which a quantity can be typed and shown, with their factors to SI. Symbols are in `words`.

use super::{
    AIR_FLOW_PER_CFM, KELVIN_AT_ZERO_CELSIUS, Kind, METRES_PER_FOOT,
    SQUARE_METRES_PER_CIRCULAR_MIL, WATTS_PER_HORSEPOWER,
};

/// A unit of measurement.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Unit {
    /// Ampere.
    Ampere,
    /// Kiloampere.
    Kiloampere,
    /// Volt.
    Volt,
    /// Kilovolt.
    Kilovolt,
    /// Watt.
    Watt,
    /// Kilowatt.
    Kilowatt,
    /// Horsepower.
    Horsepower,
    /// Volt ampere.
    VoltAmpere,
    /// Kilovolt ampere.
    KilovoltAmpere,
    /// Megavolt ampere.
    MegavoltAmpere,
    /// Ohm per kilometre.
    OhmPerKilometre,
    /// Ohm per thousand feet.
    OhmPerThousandFeet,
    /// Henry.
    Henry,
    /// Millihenry.
    Millihenry,
    /// Microhenry.
    Microhenry,
    /// Hertz.
    Hertz,
    /// Metre.
    Metre,
    /// Millimetre.
    Millimetre,
    /// Centimetre.
    Centimetre,
    /// Foot.
    Foot,
    /// Inch.
    Inch,
    /// Square metre.
    SquareMetre,
    /// Square foot.
    SquareFoot,
    /// Square millimetre.
    SquareMillimetre,
    /// Circular mil.
    CircularMil,
    /// Thousand circular mils.
    ThousandCircularMils,
    /// Celsius.
    Celsius,
    /// Fahrenheit.
    Fahrenheit,
    /// Kelvin.
    Kelvin,
    /// Kelvin difference.
    KelvinDifference,
    /// Fahrenheit difference.
    FahrenheitDifference,
    /// Watt per square metre kelvin.
    WattPerSquareMetreKelvin,
    /// Watt per kelvin.
    WattPerKelvin,
    /// Pascal.
    Pascal,
    /// Kilopascal.
    Kilopascal,
    /// Kilogram per cubic metre.
    KilogramPerCubicMetre,
    /// Joule per kilogram kelvin.
    JoulePerKilogramKelvin,
    /// Cubic metre per second.
    CubicMetrePerSecond,
    /// Cubic metre per hour.
    CubicMetrePerHour,
    /// Cubic foot per minute.
    CubicFootPerMinute,
    /// Metre per ohm.
    MetrePerOhm,
    /// Foot per ohm.
    FootPerOhm,
    /// One.
    One,
    /// Per cent.
    PerCent,
}

impl Unit {
    /// Every unit, in the order of the kinds.
    pub const ALL: [Unit; 44] = [
        Unit::Ampere,
        Unit::Kiloampere,
        Unit::Volt,
        Unit::Kilovolt,
        Unit::Watt,
        Unit::Kilowatt,
        Unit::Horsepower,
        Unit::VoltAmpere,
        Unit::KilovoltAmpere,
        Unit::MegavoltAmpere,
        Unit::OhmPerKilometre,
        Unit::OhmPerThousandFeet,
        Unit::Henry,
        Unit::Millihenry,
        Unit::Microhenry,
        Unit::Hertz,
        Unit::Metre,
        Unit::Millimetre,
        Unit::Centimetre,
        Unit::Foot,
        Unit::Inch,
        Unit::SquareMetre,
        Unit::SquareFoot,
        Unit::SquareMillimetre,
        Unit::CircularMil,
        Unit::ThousandCircularMils,
        Unit::Celsius,
        Unit::Fahrenheit,
        Unit::Kelvin,
        Unit::KelvinDifference,
        Unit::FahrenheitDifference,
        Unit::WattPerSquareMetreKelvin,
        Unit::WattPerKelvin,
        Unit::Pascal,
        Unit::Kilopascal,
        Unit::KilogramPerCubicMetre,
        Unit::JoulePerKilogramKelvin,
        Unit::CubicMetrePerSecond,
        Unit::CubicMetrePerHour,
        Unit::CubicFootPerMinute,
        Unit::MetrePerOhm,
        Unit::FootPerOhm,
        Unit::One,
        Unit::PerCent,
    ];

    /// Whether this unit measures quantities of `kind`.
    pub fn measures(self, kind: Kind) -> bool {
        match self {
            Unit::Ampere | Unit::Kiloampere => kind == Kind::Current,
            Unit::Volt | Unit::Kilovolt => kind == Kind::Voltage,
            Unit::Watt | Unit::Kilowatt | Unit::Horsepower => {
                matches!(kind, Kind::Power | Kind::ShaftPower)
            }
            Unit::VoltAmpere | Unit::KilovoltAmpere | Unit::MegavoltAmpere => {
                kind == Kind::ApparentPower
            }
            Unit::OhmPerKilometre | Unit::OhmPerThousandFeet => kind == Kind::ImpedancePerLength,
            Unit::Henry | Unit::Millihenry | Unit::Microhenry => kind == Kind::Inductance,
            Unit::Hertz => kind == Kind::Frequency,
            Unit::Metre | Unit::Millimetre | Unit::Centimetre | Unit::Foot | Unit::Inch => {
                kind == Kind::Length
            }
            Unit::SquareMetre | Unit::SquareFoot => kind == Kind::Area,
            Unit::SquareMillimetre | Unit::CircularMil | Unit::ThousandCircularMils => {
                kind == Kind::CrossSection
            }
            Unit::Celsius | Unit::Fahrenheit | Unit::Kelvin => kind == Kind::Temperature,
            Unit::KelvinDifference | Unit::FahrenheitDifference => {
                kind == Kind::TemperatureDifference
            }
            Unit::WattPerSquareMetreKelvin => kind == Kind::Transmittance,
            Unit::WattPerKelvin => kind == Kind::HeatConductance,
            Unit::Pascal | Unit::Kilopascal => kind == Kind::Pressure,
            Unit::KilogramPerCubicMetre => kind == Kind::Density,
            Unit::JoulePerKilogramKelvin => kind == Kind::SpecificHeat,
            Unit::CubicMetrePerSecond | Unit::CubicMetrePerHour | Unit::CubicFootPerMinute => {
                kind == Kind::AirFlow
            }
            Unit::MetrePerOhm | Unit::FootPerOhm => kind == Kind::LengthPerImpedance,
            Unit::One | Unit::PerCent => kind == Kind::Ratio,
        }
    }

    /// `number` of this unit, in the SI unit of its kind.
    pub const fn to_si(self, number: f64) -> f64 {
        match self {
            Unit::Celsius => number + KELVIN_AT_ZERO_CELSIUS,
            Unit::Fahrenheit => (number - 32.0) * 5.0 / 9.0 + KELVIN_AT_ZERO_CELSIUS,
            _ => number * self.factor(),
        }
    }

    /// How many of this unit `si` is.
    pub const fn from_si(self, si: f64) -> f64 {
        match self {
            Unit::Celsius => si - KELVIN_AT_ZERO_CELSIUS,
            Unit::Fahrenheit => (si - KELVIN_AT_ZERO_CELSIUS) * 9.0 / 5.0 + 32.0,
            _ => si / self.factor(),
        }
    }

    const fn factor(self) -> f64 {
        match self {
            Unit::Ampere => 1.0,
            Unit::Kiloampere => 1e3,
            Unit::Volt => 1.0,
            Unit::Kilovolt => 1e3,
            Unit::Watt => 1.0,
            Unit::Kilowatt => 1e3,
            Unit::Horsepower => WATTS_PER_HORSEPOWER,
            Unit::VoltAmpere => 1.0,
            Unit::KilovoltAmpere => 1e3,
            Unit::MegavoltAmpere => 1e6,
            Unit::OhmPerKilometre => 1e-3,
            Unit::OhmPerThousandFeet => 1.0 / (1000.0 * METRES_PER_FOOT),
            Unit::Henry => 1.0,
            Unit::Millihenry => 1e-3,
            Unit::Microhenry => 1e-6,
            Unit::Hertz => 1.0,
            Unit::Metre => 1.0,
            Unit::Millimetre => 1e-3,
            Unit::Centimetre => 1e-2,
            Unit::Foot => METRES_PER_FOOT,
            Unit::Inch => 0.0254,
            Unit::SquareMetre => 1.0,
            Unit::SquareFoot => METRES_PER_FOOT * METRES_PER_FOOT,
            Unit::SquareMillimetre => 1e-6,
            Unit::CircularMil => SQUARE_METRES_PER_CIRCULAR_MIL,
            Unit::ThousandCircularMils => 1e3 * SQUARE_METRES_PER_CIRCULAR_MIL,
            Unit::Celsius => 1.0,
            Unit::Fahrenheit => 5.0 / 9.0,
            Unit::Kelvin => 1.0,
            Unit::KelvinDifference => 1.0,
            Unit::FahrenheitDifference => 5.0 / 9.0,
            Unit::WattPerSquareMetreKelvin => 1.0,
            Unit::WattPerKelvin => 1.0,
            Unit::Pascal => 1.0,
            Unit::Kilopascal => 1e3,
            Unit::KilogramPerCubicMetre => 1.0,
            Unit::JoulePerKilogramKelvin => 1.0,
            Unit::CubicMetrePerSecond => 1.0,
            Unit::CubicMetrePerHour => 1.0 / 3600.0,
            Unit::CubicFootPerMinute => AIR_FLOW_PER_CFM,
            Unit::MetrePerOhm => 1.0,
            Unit::FootPerOhm => METRES_PER_FOOT,
            Unit::One => 1.0,
            Unit::PerCent => 0.01,
        }
    }
}
