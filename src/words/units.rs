//! Unit symbols, and amounts as text in the units of the sheet.

use super::numbers::{Rounding, number, rounding};
use crate::quantity::{Current, Kind, Quantity, Unit, WireSize};
use crate::sheet::{Shape, UnitSystem, spec};
use crate::tables::DeviceType;
use crate::working::{Amount, Field};

/// The current from which amperes are shown as kiloamperes.
const KILOAMPERES_FROM: f64 = 10_000.0;
/// The area from which conductors are told in thousands of circular mils, as their names are.
const KCMIL_FROM: f64 = 250_000.0;

/// The symbol of `unit`. A difference of temperatures has the symbol of its temperature.
pub const fn unit_symbol(unit: Unit) -> &'static str {
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
        Unit::OhmPerKilometre => "Ω/km",
        Unit::OhmPerThousandFeet => "Ω/kft",
        Unit::Henry => "H",
        Unit::Millihenry => "mH",
        Unit::Microhenry => "µH",
        Unit::Hertz => "Hz",
        Unit::Metre => "m",
        Unit::Millimetre => "mm",
        Unit::Centimetre => "cm",
        Unit::Foot => "ft",
        Unit::Inch => "in",
        Unit::SquareMetre => "m²",
        Unit::SquareFoot => "ft²",
        Unit::SquareMillimetre => "mm²",
        Unit::CircularMil => "cmil",
        Unit::ThousandCircularMils => "kcmil",
        Unit::Celsius => "°C",
        Unit::Fahrenheit => "°F",
        Unit::Kelvin => "K",
        Unit::KelvinDifference => "K",
        Unit::FahrenheitDifference => "°F",
        Unit::WattPerSquareMetreKelvin => "W/m²K",
        Unit::WattPerKelvin => "W/K",
        Unit::Pascal => "Pa",
        Unit::Kilopascal => "kPa",
        Unit::KilogramPerCubicMetre => "kg/m³",
        Unit::JoulePerKilogramKelvin => "J/kgK",
        Unit::CubicMetrePerSecond => "m³/s",
        Unit::CubicMetrePerHour => "m³/h",
        Unit::CubicFootPerMinute => "CFM",
        Unit::MetrePerOhm => "m/Ω",
        Unit::FootPerOhm => "ft/Ω",
        Unit::One => "",
        Unit::PerCent => "%",
    }
}

/// The unit in which quantities of `kind` are shown where no field sets another.
pub const fn unit_of(kind: Kind, system: UnitSystem) -> Unit {
    let is_us = matches!(system, UnitSystem::Us);
    match kind {
        Kind::Current => Unit::Ampere,
        Kind::Voltage => Unit::Volt,
        Kind::Power => Unit::Watt,
        Kind::ShaftPower if is_us => Unit::Horsepower,
        Kind::ShaftPower => Unit::Kilowatt,
        Kind::ApparentPower => Unit::KilovoltAmpere,
        Kind::ImpedancePerLength if is_us => Unit::OhmPerThousandFeet,
        Kind::ImpedancePerLength => Unit::OhmPerKilometre,
        Kind::Inductance => Unit::Millihenry,
        Kind::Frequency => Unit::Hertz,
        Kind::Length if is_us => Unit::Foot,
        Kind::Length => Unit::Metre,
        Kind::Area if is_us => Unit::SquareFoot,
        Kind::Area => Unit::SquareMetre,
        Kind::CrossSection if is_us => Unit::ThousandCircularMils,
        Kind::CrossSection => Unit::SquareMillimetre,
        Kind::Temperature if is_us => Unit::Fahrenheit,
        Kind::Temperature => Unit::Celsius,
        Kind::TemperatureDifference if is_us => Unit::FahrenheitDifference,
        Kind::TemperatureDifference => Unit::KelvinDifference,
        Kind::Transmittance => Unit::WattPerSquareMetreKelvin,
        Kind::HeatConductance => Unit::WattPerKelvin,
        Kind::Pressure => Unit::Kilopascal,
        Kind::Density => Unit::KilogramPerCubicMetre,
        Kind::SpecificHeat => Unit::JoulePerKilogramKelvin,
        Kind::AirFlow if is_us => Unit::CubicFootPerMinute,
        Kind::AirFlow => Unit::CubicMetrePerHour,
        Kind::LengthPerImpedance if is_us => Unit::FootPerOhm,
        Kind::LengthPerImpedance => Unit::MetrePerOhm,
        Kind::Ratio => Unit::PerCent,
    }
}

/// As [`unit_of`], but large currents in kiloamperes and small conductor areas in circular mils.
pub fn unit_for_value(kind: Kind, si: f64, system: UnitSystem) -> Unit {
    match kind {
        Kind::Current if si.abs() >= KILOAMPERES_FROM => Unit::Kiloampere,
        Kind::CrossSection
            if system == UnitSystem::Us && Unit::CircularMil.from_si(si.abs()) < KCMIL_FROM =>
        {
            Unit::CircularMil
        }
        _ => unit_of(kind, system),
    }
}

/// `text` with `unit` after it.
pub fn with_unit(text: &str, unit: Unit) -> String {
    match unit_symbol(unit) {
        "" => text.to_owned(),
        symbol => format!("{text} {symbol}"),
    }
}

/// A value of `si` in `unit`, without the unit.
pub fn bare_in(si: f64, unit: Unit) -> String {
    let value = unit.from_si(si);
    number(value, rounding(unit, value))
}

/// An amount with its unit: `67.5 A`, `3/0 AWG`.
pub fn amount(amount: Amount, system: UnitSystem) -> String {
    match amount {
        Amount::Measured { si, kind } => {
            let unit = unit_for_value(kind, si, system);
            with_unit(&bare_in(si, unit), unit)
        }
        Amount::Count(count) => whole(count),
        Amount::Size(wire) => size(wire),
    }
}

/// An amount in `unit`, with the unit. An amount which `unit` does not measure is shown in the unit of its kind.
pub fn amount_in(shown: Amount, unit: Unit) -> String {
    match shown {
        Amount::Measured { si, kind } if unit.measures(kind) => with_unit(&bare_in(si, unit), unit),
        other => amount(other, UnitSystem::Si),
    }
}

/// An amount without its unit, in the unit of its kind, for cells whose head shows the unit.
pub fn bare(amount: Amount, system: UnitSystem) -> String {
    match amount {
        Amount::Measured { si, kind } => bare_in(si, unit_of(kind, system)),
        Amount::Count(count) => whole(count),
        Amount::Size(wire) => size(wire),
    }
}

/// A quantity with its unit.
pub fn quantity<Q: Quantity>(quantity: Q, system: UnitSystem) -> String {
    amount(Amount::from(quantity), system)
}

/// Two amounts with their units, for a comparison: where they differ, they are shown with as many digits as it takes to
/// tell them apart, so that rounding never hides which of them is the larger.
pub fn apart(first: Amount, second: Amount, system: UnitSystem) -> (String, String) {
    let shown = (amount(first, system), amount(second, system));
    match (first, second) {
        (Amount::Measured { si: a, kind }, Amount::Measured { si: b, .. })
            if shown.0 == shown.1 =>
        {
            let unit = unit_for_value(kind, a.min(b), system);
            let (a, b) = (unit.from_si(a), unit.from_si(b));
            (1..=9)
                .map(Rounding::Decimals)
                .map(|places| (number(a, places), number(b, places)))
                .find(|(a, b)| a != b)
                .map_or(shown, |(a, b)| (with_unit(&a, unit), with_unit(&b, unit)))
        }
        _ => shown,
    }
}

/// [`apart`] for two quantities of one kind.
pub fn quantities_apart<Q: Quantity>(first: Q, second: Q, system: UnitSystem) -> (String, String) {
    apart(Amount::from(first), Amount::from(second), system)
}

/// A whole number.
pub fn whole(count: u32) -> String {
    number(f64::from(count), Rounding::Decimals(0))
}

/// A conductor size as the trade writes it: `4 AWG`, `250 kcmil`.
pub fn size(size: WireSize) -> String {
    let unit = if size.is_gauge() { "AWG" } else { "kcmil" };
    format!("{} {unit}", size.number())
}

/// Conductors in parallel: `2 × 3/0 AWG`, or the size alone for one set.
pub fn sets(sets: u32, wire: WireSize) -> String {
    if sets == 1 {
        size(wire)
    } else {
        format!("{} × {}", whole(sets), size(wire))
    }
}

/// The type of a protective device.
pub const fn device_type(device: DeviceType) -> &'static str {
    match device {
        DeviceType::TimeDelayFuse => "time-delay fuse",
        DeviceType::NontimeDelayFuse => "nontime-delay fuse",
        DeviceType::ClassCcFuse => "Class CC fuse",
        DeviceType::InverseTimeBreaker => "inverse time breaker",
    }
}

/// A protective device: `80 A time-delay fuse`.
pub fn device(rating: Current, device: DeviceType, system: UnitSystem) -> String {
    format!("{} {}", quantity(rating, system), device_type(device))
}

/// The unit of `field` in the sheet's units; `None` where the field is not measured.
pub fn field_unit(field: Field, system: UnitSystem) -> Option<Unit> {
    match spec(field).shape {
        Shape::Measured { .. } => Some(spec(field).unit(system)),
        _ => None,
    }
}

/// The symbol of [`field_unit`]; empty where the field is not measured.
pub fn field_symbol(field: Field, system: UnitSystem) -> &'static str {
    field_unit(field, system).map_or("", unit_symbol)
}
