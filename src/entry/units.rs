//! How units are written.

use super::Refusal;
use crate::quantity::{Kind, Unit};

/// The units which may be typed for a quantity of `kind`.
///
/// A ratio is typed in per cent alone: `0.85` for 85 % would be refused in one field and believed in the next.
pub fn units_for(kind: Kind) -> Vec<Unit> {
    Unit::ALL
        .into_iter()
        .filter(|unit| unit.measures(kind) && *unit != Unit::One)
        .collect()
}

/// The unit of `kind` which is written as `typed`.
pub(super) fn unit(typed: &str, kind: Kind) -> Result<Unit, Refusal> {
    let spelling = Spelling::of(typed);
    let fits = units_for(kind);
    // Those which fit come first: a temperature and a difference of temperatures share their symbols.
    if let Some(unit) = fits.iter().find(|unit| spelling.means(**unit)) {
        return Ok(*unit);
    }
    let unit = typed.to_owned();
    Err(if Unit::ALL.into_iter().any(|unit| spelling.means(unit)) {
        Refusal::WrongUnit { unit, fits }
    } else {
        Refusal::UnknownUnit { unit, fits }
    })
}

/// A unit as typed, brought to plain small letters.
pub(super) struct Spelling(String);

impl Spelling {
    pub(super) fn of(typed: &str) -> Self {
        // A thousandth of a volt ampere is nobody's transformer, and a million is `M`: the one prefix here whose case counts.
        if typed.starts_with("mV") {
            return Self(typed.to_owned());
        }
        let plain = typed.trim().trim_end_matches('.').chars().map(plain);
        Self(plain.collect::<String>().to_lowercase())
    }

    pub(super) fn means(&self, unit: Unit) -> bool {
        unit_spellings(unit).contains(&self.0.as_str())
    }
}

/// A character of a unit in ASCII; empty for what only keeps parts apart.
fn plain(part: char) -> String {
    match part {
        '²' => "2".to_owned(),
        '³' => "3".to_owned(),
        'Ω' | '\u{2126}' => "ohm".to_owned(),
        'µ' | 'μ' => "u".to_owned(),
        '°' | 'º' => "deg".to_owned(),
        '″' | '”' | '“' => "\"".to_owned(),
        '′' | '’' | '‘' => "'".to_owned(),
        '·' | '⋅' | '*' | '^' | '(' | ')' => String::new(),
        blank if blank.is_whitespace() => String::new(),
        other => other.to_string(),
    }
}

/// How `unit` may be written, in plain small letters and without blanks: see the module.
pub const fn unit_spellings(unit: Unit) -> &'static [&'static str] {
    match unit {
        Unit::Ampere => &["a", "amp", "amps", "ampere", "amperes"],
        Unit::Kiloampere => &["ka", "kiloampere", "kiloamperes"],
        Unit::Volt => &["v", "vac", "volt", "volts"],
        Unit::Kilovolt => &["kv", "kilovolt", "kilovolts"],
        Unit::Watt => &["w", "watt", "watts"],
        Unit::Kilowatt => &["kw", "kilowatt", "kilowatts"],
        Unit::Horsepower => &["hp", "horsepower"],
        Unit::VoltAmpere => &["va"],
        Unit::KilovoltAmpere => &["kva"],
        Unit::MegavoltAmpere => &["mva"],
        Unit::OhmPerKilometre => &["ohm/km", "ohms/km"],
        Unit::OhmPerThousandFeet => &["ohm/kft", "ohms/kft", "ohm/1000ft", "ohms/1000ft"],
        Unit::Henry => &["h", "henry"],
        Unit::Millihenry => &["mh"],
        Unit::Microhenry => &["uh"],
        Unit::Hertz => &["hz", "hertz"],
        Unit::Metre => &["m", "metre", "metres", "meter", "meters"],
        Unit::Millimetre => &[
            "mm",
            "millimetre",
            "millimetres",
            "millimeter",
            "millimeters",
        ],
        Unit::Centimetre => &[
            "cm",
            "centimetre",
            "centimetres",
            "centimeter",
            "centimeters",
        ],
        Unit::Foot => &["ft", "'", "foot", "feet"],
        Unit::Inch => &["in", "\"", "''", "inch", "inches"],
        Unit::SquareMetre => &["m2", "sqm"],
        Unit::SquareFoot => &["ft2", "sqft"],
        Unit::SquareMillimetre => &["mm2", "sqmm"],
        Unit::CircularMil => &["cmil", "cmils"],
        Unit::ThousandCircularMils => &["kcmil", "mcm"],
        Unit::Celsius => &["degc", "c", "celsius", "degreesc"],
        Unit::Fahrenheit => &["degf", "f", "fahrenheit", "degreesf"],
        Unit::Kelvin => &["k", "kelvin"],
        Unit::KelvinDifference => &["k", "kelvin", "degc"],
        Unit::FahrenheitDifference => &["degf", "f"],
        Unit::WattPerSquareMetreKelvin => &["w/m2k", "w/m2/k", "w/km2", "w/m2degc"],
        Unit::WattPerKelvin => &["w/k", "w/degc"],
        Unit::Pascal => &["pa", "pascal"],
        Unit::Kilopascal => &["kpa", "kilopascal"],
        Unit::KilogramPerCubicMetre => &["kg/m3"],
        Unit::JoulePerKilogramKelvin => &["j/kgk", "j/kg/k"],
        Unit::CubicMetrePerSecond => &["m3/s"],
        Unit::CubicMetrePerHour => &["m3/h", "m3/hr", "cmh"],
        Unit::CubicFootPerMinute => &["cfm", "ft3/min", "cuft/min"],
        Unit::MetrePerOhm => &["m/ohm"],
        Unit::FootPerOhm => &["ft/ohm"],
        Unit::One => &["x"],
        Unit::PerCent => &["%", "percent", "pct"],
    }
}
