//! Which quantities may be combined, listed once. What is not listed does not compile.

use super::{
    AirFlow, ApparentPower, Area, CrossSection, Current, HeatConductance, Length, Power, Pressure,
    Quantity, Ratio, ShaftPower, Temperature, TemperatureDifference, Transmittance, Voltage,
};
use core::iter::Sum;
use core::ops::{Add, Div, Mul, Sub};

macro_rules! product {
    ($($a:ident * $b:ident = $c:ident;)+) => {
        $(
            impl Mul<$b> for $a {
                type Output = $c;
                fn mul(self, other: $b) -> $c { $c::from_si(self.si() * other.si()) }
            }
        )+
    };
}

macro_rules! amounts {
    ($($a:ident)+) => {
        $(
            impl Add for $a {
                type Output = $a;
                fn add(self, other: $a) -> $a { $a::from_si(self.si() + other.si()) }
            }
            impl Sub for $a {
                type Output = $a;
                fn sub(self, other: $a) -> $a { $a::from_si(self.si() - other.si()) }
            }
            impl Mul<$a> for f64 {
                type Output = $a;
                fn mul(self, other: $a) -> $a { $a::from_si(self * other.si()) }
            }
            impl Mul<$a> for Ratio {
                type Output = $a;
                fn mul(self, other: $a) -> $a { $a::from_si(self.si() * other.si()) }
            }
            impl Div<$a> for $a {
                type Output = Ratio;
                fn div(self, other: $a) -> Ratio { Ratio::of_one(self.si() / other.si()) }
            }
            impl Sum for $a {
                fn sum<I: Iterator<Item = $a>>(items: I) -> $a { items.fold($a::from_si(0.0), Add::add) }
            }
        )+
    };
}

amounts!(Current Voltage Power ShaftPower ApparentPower Length Area CrossSection TemperatureDifference HeatConductance Pressure AirFlow);

product! {
    Voltage * Current = ApparentPower;
    Length * Length = Area;
    Transmittance * Area = HeatConductance;
    HeatConductance * TemperatureDifference = Power;
}

impl Mul for Ratio {
    type Output = Ratio;
    fn mul(self, other: Ratio) -> Ratio {
        Ratio::of_one(self.si() * other.si())
    }
}

impl Add<TemperatureDifference> for Temperature {
    type Output = Temperature;
    fn add(self, rise: TemperatureDifference) -> Temperature {
        Temperature::from_si(self.si() + rise.si())
    }
}

impl Sub for Temperature {
    type Output = TemperatureDifference;
    fn sub(self, other: Temperature) -> TemperatureDifference {
        TemperatureDifference::from_si(self.si() - other.si())
    }
}

impl Div<HeatConductance> for Power {
    type Output = TemperatureDifference;
    fn div(self, conductance: HeatConductance) -> TemperatureDifference {
        TemperatureDifference::from_si(self.si() / conductance.si())
    }
}
