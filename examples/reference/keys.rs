//! Keys: the name of a quantity and its unit, and the values under them.

use super::rows::Pair;
use std::collections::BTreeMap;
use ventrail::quantity::{Kind, Quantity, Unit, WireSize};

/// What stands under a key.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Takes {
    /// A quantity; the key ends in its unit.
    Measured(Kind),
    /// Several of them, parted by commas.
    Several(Kind),
    /// A number whose unit is part of the name.
    Number,
    /// A whole number.
    Count,
    /// Several whole numbers, parted by commas.
    Counts,
    /// A conductor size: gauge number, or thousands of circular mils from 250.
    Size,
    /// Several sizes, parted by commas.
    Sizes,
    /// One of these words.
    Word(&'static [&'static str]),
}

/// One key of a topic.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Key {
    /// Its name without the unit.
    pub stem: &'static str,
    /// What stands under it.
    pub takes: Takes,
    /// Whether it may be left out.
    pub is_needed: bool,
    /// What it means, and what stands for it where it is left out.
    pub about: &'static str,
}

/// A key which must stand in every row of the topic.
pub const fn needed(stem: &'static str, takes: Takes, about: &'static str) -> Key {
    Key {
        stem,
        takes,
        is_needed: true,
        about,
    }
}

/// A key which may be left out.
pub const fn optional(stem: &'static str, takes: Takes, about: &'static str) -> Key {
    Key {
        is_needed: false,
        ..needed(stem, takes, about)
    }
}

/// A scale on which a quantity is written.
#[derive(Debug, Clone, Copy, PartialEq)]
enum Scale {
    Unit(Unit),
    /// Heat as cooling apparatus is sold by it; the sheet has no such unit.
    BtuPerHour,
}

const WATTS_PER_BTU_PER_HOUR: f64 = 0.293_071_07;

impl Scale {
    fn si_of(self, number: f64) -> f64 {
        match self {
            Scale::Unit(unit) => unit.to_si(number),
            Scale::BtuPerHour => number * WATTS_PER_BTU_PER_HOUR,
        }
    }

    fn number_of(self, si: f64) -> f64 {
        match self {
            Scale::Unit(unit) => unit.from_si(si),
            Scale::BtuPerHour => si / WATTS_PER_BTU_PER_HOUR,
        }
    }
}

/// How units are written at the end of a key.
const SUFFIXES: [(&str, Unit); 44] = [
    ("a", Unit::Ampere),
    ("ka", Unit::Kiloampere),
    ("v", Unit::Volt),
    ("kv", Unit::Kilovolt),
    ("w", Unit::Watt),
    ("kw", Unit::Kilowatt),
    ("hp", Unit::Horsepower),
    ("va", Unit::VoltAmpere),
    ("kva", Unit::KilovoltAmpere),
    ("mva", Unit::MegavoltAmpere),
    ("ohm_per_km", Unit::OhmPerKilometre),
    ("ohm_per_kft", Unit::OhmPerThousandFeet),
    ("h", Unit::Henry),
    ("mh", Unit::Millihenry),
    ("uh", Unit::Microhenry),
    ("hz", Unit::Hertz),
    ("m", Unit::Metre),
    ("mm", Unit::Millimetre),
    ("cm", Unit::Centimetre),
    ("ft", Unit::Foot),
    ("in", Unit::Inch),
    ("m2", Unit::SquareMetre),
    ("ft2", Unit::SquareFoot),
    ("mm2", Unit::SquareMillimetre),
    ("cmil", Unit::CircularMil),
    ("kcmil", Unit::ThousandCircularMils),
    ("c", Unit::Celsius),
    ("f", Unit::Fahrenheit),
    ("k", Unit::Kelvin),
    ("k", Unit::KelvinDifference),
    ("f", Unit::FahrenheitDifference),
    ("w_per_m2k", Unit::WattPerSquareMetreKelvin),
    ("w_per_k", Unit::WattPerKelvin),
    ("pa", Unit::Pascal),
    ("kpa", Unit::Kilopascal),
    ("kg_per_m3", Unit::KilogramPerCubicMetre),
    ("j_per_kgk", Unit::JoulePerKilogramKelvin),
    ("m3_per_s", Unit::CubicMetrePerSecond),
    ("m3_per_h", Unit::CubicMetrePerHour),
    ("cfm", Unit::CubicFootPerMinute),
    ("m_per_ohm", Unit::MetrePerOhm),
    ("ft_per_ohm", Unit::FootPerOhm),
    ("pct", Unit::PerCent),
    // A ratio of one stands without a unit.
    ("", Unit::One),
];

/// The endings of keys of `kind`, for the documentation.
pub fn endings(kind: Kind) -> Vec<&'static str> {
    let mut endings: Vec<_> = SUFFIXES
        .iter()
        .filter(|(_, unit)| unit.measures(kind))
        .map(|(suffix, _)| *suffix)
        .collect();
    if kind == Kind::Power {
        endings.push("btu_per_h");
    }
    endings
}

fn scale_of(kind: Kind, suffix: &str) -> Option<Scale> {
    if kind == Kind::Power && suffix == "btu_per_h" {
        return Some(Scale::BtuPerHour);
    }
    SUFFIXES
        .iter()
        .find(|(known, unit)| *known == suffix && unit.measures(kind))
        .map(|(_, unit)| Scale::Unit(*unit))
}

/// A key of a topic as a row writes it, with its scale.
#[derive(Debug, Clone, Copy)]
struct Written {
    key: &'static Key,
    scale: Option<Scale>,
}

/// The key among `keys` which `text` writes.
fn written(text: &str, keys: &'static [Key]) -> Option<Written> {
    keys.iter().find_map(|key| {
        let rest = text.strip_prefix(key.stem)?;
        let scale = match key.takes {
            Takes::Measured(kind) | Takes::Several(kind) => {
                let suffix = match rest {
                    "" => "",
                    _ => rest.strip_prefix('_')?,
                };
                Some(scale_of(kind, suffix)?)
            }
            _ if rest.is_empty() => None,
            _ => return None,
        };
        Some(Written { key, scale })
    })
}

/// The stem which `text` writes among `keys`.
pub fn stem_of(text: &str, keys: &'static [Key]) -> Option<&'static str> {
    written(text, keys).map(|written| written.key.stem)
}

/// A value under a key: quantities in SI.
#[derive(Debug, Clone, PartialEq)]
pub enum Value {
    /// A quantity in SI, or a number.
    Number(f64),
    /// Several of them.
    Numbers(Vec<f64>),
    /// A word or a conductor size.
    Word(String),
    /// Several of them.
    Words(Vec<String>),
}

/// What the core gave, by stem.
pub type Answers = BTreeMap<&'static str, Value>;

/// The inputs of a row, by stem.
#[derive(Debug, Clone, PartialEq)]
pub struct Inputs {
    values: BTreeMap<&'static str, Value>,
}

impl Inputs {
    /// Reads a row's pairs by the keys of its topic.
    pub fn of(pairs: &[Pair], keys: &'static [Key]) -> Result<Self, String> {
        let mut values = BTreeMap::new();
        for pair in pairs {
            let Some(written) = written(&pair.key, keys) else {
                return Err(format!("the topic has no input {}", pair.key));
            };
            let value = value_of(pair, written, |scale, number| scale.si_of(number))?;
            if values.insert(written.key.stem, value).is_some() {
                return Err(format!("the input {} stands twice", written.key.stem));
            }
        }
        match keys
            .iter()
            .find(|key| key.is_needed && !values.contains_key(key.stem))
        {
            Some(missing) => Err(format!("the input {} is missing", missing.stem)),
            None => Ok(Self { values }),
        }
    }

    /// The quantity under `stem`, which must stand.
    pub fn measured<Q: Quantity>(&self, stem: &'static str) -> Result<Q, String> {
        self.maybe(stem).ok_or_else(|| missing(stem))
    }

    /// The quantity under `stem`.
    pub fn maybe<Q: Quantity>(&self, stem: &'static str) -> Option<Q> {
        self.number(stem).map(Q::from_si)
    }

    /// The quantity under `stem`, else `otherwise`.
    pub fn measured_or<Q: Quantity>(&self, stem: &'static str, otherwise: Q) -> Q {
        self.maybe(stem).unwrap_or(otherwise)
    }

    /// The quantities under `stem`; none where it is left out.
    pub fn several<Q: Quantity>(&self, stem: &'static str) -> Vec<Q> {
        match self.values.get(stem) {
            Some(Value::Numbers(numbers)) => numbers.iter().map(|si| Q::from_si(*si)).collect(),
            _ => Vec::new(),
        }
    }

    /// The number under `stem`.
    pub fn number(&self, stem: &'static str) -> Option<f64> {
        match self.values.get(stem)? {
            Value::Number(number) => Some(*number),
            _ => None,
        }
    }

    /// The whole number under `stem`, else `otherwise`.
    pub fn count_or(&self, stem: &'static str, otherwise: u32) -> u32 {
        match self.values.get(stem) {
            Some(Value::Word(word)) => word.parse().unwrap_or(otherwise),
            _ => otherwise,
        }
    }

    /// The whole numbers under `stem`; none where it is left out.
    pub fn counts(&self, stem: &'static str) -> Vec<u32> {
        self.words(stem)
            .iter()
            .filter_map(|word| word.parse().ok())
            .collect()
    }

    /// The word under `stem`.
    pub fn word(&self, stem: &'static str) -> Option<&str> {
        match self.values.get(stem)? {
            Value::Word(word) => Some(word),
            _ => None,
        }
    }

    /// The size under `stem`, which must stand.
    pub fn size(&self, stem: &'static str) -> Result<WireSize, String> {
        self.word(stem)
            .and_then(WireSize::from_number)
            .ok_or_else(|| missing(stem))
    }

    /// The sizes under `stem`; none where it is left out.
    pub fn sizes(&self, stem: &'static str) -> Vec<WireSize> {
        self.words(stem)
            .iter()
            .filter_map(|word| WireSize::from_number(word))
            .collect()
    }

    fn words(&self, stem: &'static str) -> &[String] {
        match self.values.get(stem) {
            Some(Value::Words(words)) => words,
            _ => &[],
        }
    }
}

/// What is said where an input is missing.
pub fn missing(stem: &str) -> String {
    format!("the input {stem} is missing")
}

/// An expected pair read by the keys of its topic, with the answer in the same unit; `None` where the core gave none.
pub fn expected_and_got(
    pair: &Pair,
    keys: &'static [Key],
    answers: &Answers,
) -> Result<(Value, Option<Value>), String> {
    let Some(written) = written(&pair.key, keys) else {
        return Err(format!("the topic does not give {}", pair.key));
    };
    let got = answers
        .get(written.key.stem)
        .map(|value| match written.scale {
            Some(scale) => match value {
                Value::Number(si) => Value::Number(scale.number_of(*si)),
                Value::Numbers(all) => {
                    Value::Numbers(all.iter().map(|si| scale.number_of(*si)).collect())
                }
                other => other.clone(),
            },
            None => value.clone(),
        });
    if pair.value == NONE {
        return Ok((Value::Word(NONE.to_owned()), got));
    }
    let expected = value_of(pair, written, |_, number| number)?;
    Ok((expected, got))
}

/// Stands where the core must give nothing.
pub const NONE: &str = "none";

fn value_of(
    pair: &Pair,
    written: Written,
    scaled: impl Fn(Scale, f64) -> f64,
) -> Result<Value, String> {
    let wrong = |what: &str| format!("{}={} is no {what}", pair.key, pair.value);
    let number = |text: &str| -> Result<f64, String> {
        match text.trim().parse::<f64>() {
            Ok(number) if number.is_finite() => {
                Ok(written.scale.map_or(number, |scale| scaled(scale, number)))
            }
            _ => Err(wrong("number")),
        }
    };
    let whole = |text: &str| -> Result<String, String> {
        match text.trim().parse::<u32>() {
            Ok(count) => Ok(count.to_string()),
            Err(_) => Err(wrong("whole number")),
        }
    };
    let size = |text: &str| match WireSize::from_number(text.trim()) {
        Some(size) => Ok(size.number().to_owned()),
        None => Err(wrong("conductor size")),
    };
    let parts = || pair.value.split(',');
    match written.key.takes {
        Takes::Measured(_) | Takes::Number => number(&pair.value).map(Value::Number),
        Takes::Several(_) => parts()
            .map(number)
            .collect::<Result<_, _>>()
            .map(Value::Numbers),
        Takes::Count => whole(&pair.value).map(Value::Word),
        Takes::Counts => parts()
            .map(whole)
            .collect::<Result<_, _>>()
            .map(Value::Words),
        Takes::Size => size(&pair.value).map(Value::Word),
        Takes::Sizes => parts()
            .map(size)
            .collect::<Result<_, _>>()
            .map(Value::Words),
        Takes::Word(offered) if offered.contains(&pair.value.as_str()) => {
            Ok(Value::Word(pair.value.clone()))
        }
        Takes::Word(offered) => Err(wrong(&format!("one of {}", offered.join(", ")))),
    }
}
