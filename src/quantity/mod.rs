//! Quantities: one type for each kind of quantity, stored in SI, so that a bare number never travels.
//!
//! Here: the types, the units a person may type or read, the relations between the types, and the wire-gauge scale.
//! Not here: symbols and number formats (`words`), allowed ranges (`sheet`). Start with [`Kind`] and [`Unit`].

mod relations;
mod units;
mod wire;

pub use units::Unit;
pub use wire::WireSize;

/// A kind of quantity. Kinds which share a dimension but must not mix are apart: active and apparent power, a
/// temperature and a difference of temperatures.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Kind {
    /// Electric current, RMS.
    Current,
    /// Voltage between lines, RMS.
    Voltage,
    /// Active power, heat.
    Power,
    /// Rated power at a motor's shaft.
    ShaftPower,
    /// Apparent power.
    ApparentPower,
    /// Resistance or reactance of a conductor for its length.
    ImpedancePerLength,
    /// Inductance.
    Inductance,
    /// Frequency.
    Frequency,
    /// Length, height above sea level.
    Length,
    /// Area of a surface.
    Area,
    /// Area of a conductor.
    CrossSection,
    /// Temperature.
    Temperature,
    /// Difference of two temperatures.
    TemperatureDifference,
    /// Heat through a wall for its area and temperature difference.
    Transmittance,
    /// Heat through all walls for a temperature difference.
    HeatConductance,
    /// Pressure.
    Pressure,
    /// Density.
    Density,
    /// Heat which warms a mass by a temperature difference.
    SpecificHeat,
    /// Volume of air for a time.
    AirFlow,
    /// The constant C of the point-to-point fault current method: length for a resistance.
    LengthPerImpedance,
    /// A ratio, factor or share.
    Ratio,
}

/// What all quantity types can do: say their kind, and give and take their value in SI at the edges.
pub trait Quantity: Copy {
    /// The kind of this quantity.
    const KIND: Kind;
    /// The quantity of `si` in the SI unit of its kind.
    fn from_si(si: f64) -> Self;
    /// The value in the SI unit of its kind.
    fn si(self) -> f64;
}

macro_rules! quantity {
    ($(#[$doc:meta])* $name:ident { $($make:ident / $read:ident = $factor:expr),+ $(,)? }) => {
        $(#[$doc])*
        #[derive(Debug, Clone, Copy, PartialEq, PartialOrd)]
        pub struct $name(f64);
        impl $name {
            $(
                #[doc = concat!("A quantity of `value` ", stringify!($make), ".")]
                pub const fn $make(value: f64) -> Self { Self(value * $factor) }
                #[doc = concat!("The value in ", stringify!($make), ".")]
                pub const fn $read(self) -> f64 { self.0 / $factor }
            )+
        }
        impl Quantity for $name {
            const KIND: Kind = Kind::$name;
            fn from_si(si: f64) -> Self { Self(si) }
            fn si(self) -> f64 { self.0 }
        }
    };
}

/// Metres in a foot.
pub(crate) const METRES_PER_FOOT: f64 = 0.3048;
/// Watts in a horsepower as motors are rated in North America.
pub(crate) const WATTS_PER_HORSEPOWER: f64 = 746.0;
/// Square metres in a circular mil: the area of a circle of one thousandth of an inch.
pub(crate) const SQUARE_METRES_PER_CIRCULAR_MIL: f64 =
    core::f64::consts::FRAC_PI_4 * 25.4e-6 * 25.4e-6;
/// Cubic metres a second in a cubic foot a minute.
pub(crate) const AIR_FLOW_PER_CFM: f64 = METRES_PER_FOOT * METRES_PER_FOOT * METRES_PER_FOOT / 60.0;
/// Kelvin at zero degrees Celsius.
pub(crate) const KELVIN_AT_ZERO_CELSIUS: f64 = 273.15;

quantity!(
    /// RMS current in one line.
    Current { amperes / to_amperes = 1.0, kiloamperes / to_kiloamperes = 1e3 }
);
quantity!(
    /// RMS voltage between two lines.
    Voltage { volts / to_volts = 1.0 }
);
quantity!(
    /// Active power or heat.
    Power { watts / to_watts = 1.0, kilowatts / to_kilowatts = 1e3 }
);
quantity!(
    /// Rated power at a motor's shaft.
    ShaftPower { watts / to_watts = 1.0, kilowatts / to_kilowatts = 1e3, horsepower / to_horsepower = WATTS_PER_HORSEPOWER }
);
quantity!(
    /// Apparent power.
    ApparentPower { volt_amperes / to_volt_amperes = 1.0, kilovolt_amperes / to_kilovolt_amperes = 1e3 }
);
quantity!(
    /// Resistance or reactance of a conductor for its length.
    ImpedancePerLength {
        ohms_per_metre / to_ohms_per_metre = 1.0,
        ohms_per_thousand_feet / to_ohms_per_thousand_feet = 1.0 / (1000.0 * METRES_PER_FOOT),
    }
);
quantity!(
    /// Inductance.
    Inductance { henries / to_henries = 1.0, millihenries / to_millihenries = 1e-3 }
);
quantity!(
    /// Frequency.
    Frequency { hertz / to_hertz = 1.0 }
);
quantity!(
    /// A length, or a height above sea level.
    Length { metres / to_metres = 1.0, millimetres / to_millimetres = 1e-3, feet / to_feet = METRES_PER_FOOT, inches / to_inches = 0.0254 }
);
quantity!(
    /// Area of a surface.
    Area { square_metres / to_square_metres = 1.0 }
);
quantity!(
    /// Area of a conductor.
    CrossSection {
        square_metres / to_square_metres = 1.0,
        square_millimetres / to_square_millimetres = 1e-6,
        circular_mils / to_circular_mils = SQUARE_METRES_PER_CIRCULAR_MIL,
    }
);
quantity!(
    /// Difference of two temperatures.
    TemperatureDifference { kelvin / to_kelvin = 1.0, fahrenheit_degrees / to_fahrenheit_degrees = 5.0 / 9.0 }
);
quantity!(
    /// Heat through a wall for its area and temperature difference.
    Transmittance { watts_per_square_metre_kelvin / to_watts_per_square_metre_kelvin = 1.0 }
);
quantity!(
    /// Heat through all walls for a temperature difference.
    HeatConductance { watts_per_kelvin / to_watts_per_kelvin = 1.0 }
);
quantity!(
    /// Pressure.
    Pressure { pascals / to_pascals = 1.0 }
);
quantity!(
    /// Density.
    Density { kilograms_per_cubic_metre / to_kilograms_per_cubic_metre = 1.0 }
);
quantity!(
    /// Heat which warms a mass by a temperature difference.
    SpecificHeat { joules_per_kilogram_kelvin / to_joules_per_kilogram_kelvin = 1.0 }
);
quantity!(
    /// Volume of air for a time.
    AirFlow {
        cubic_metres_per_second / to_cubic_metres_per_second = 1.0,
        cubic_metres_per_hour / to_cubic_metres_per_hour = 1.0 / 3600.0,
        cubic_feet_per_minute / to_cubic_feet_per_minute = AIR_FLOW_PER_CFM,
    }
);
quantity!(
    /// The constant C of the point-to-point fault current method.
    LengthPerImpedance { metres_per_ohm / to_metres_per_ohm = 1.0, feet_per_ohm / to_feet_per_ohm = METRES_PER_FOOT }
);
quantity!(
    /// A ratio, factor or share; one is the whole.
    Ratio { of_one / to_one = 1.0, per_cent / to_per_cent = 0.01 }
);

/// A temperature, stored in kelvin.
#[derive(Debug, Clone, Copy, PartialEq, PartialOrd)]
pub struct Temperature(f64);

impl Temperature {
    /// A temperature of `value` degrees Celsius.
    pub const fn celsius(value: f64) -> Self {
        Self(value + KELVIN_AT_ZERO_CELSIUS)
    }
    /// The value in degrees Celsius.
    pub const fn to_celsius(self) -> f64 {
        self.0 - KELVIN_AT_ZERO_CELSIUS
    }
    /// A temperature of `value` degrees Fahrenheit.
    pub const fn fahrenheit(value: f64) -> Self {
        Self::celsius((value - 32.0) * 5.0 / 9.0)
    }
    /// A temperature of `value` kelvin.
    pub const fn kelvin(value: f64) -> Self {
        Self(value)
    }
    /// The value in kelvin.
    pub const fn to_kelvin(self) -> f64 {
        self.0
    }
}

impl Quantity for Temperature {
    const KIND: Kind = Kind::Temperature;
    fn from_si(si: f64) -> Self {
        Self(si)
    }
    fn si(self) -> f64 {
        self.0
    }
}
