//! Number formats: how many digits are shown, grouping, the sign.
//!
//! Here: [`number`], and the rounding of each unit. Not here: unit symbols. A second number format (decimal comma)
//! would change `punctuate` alone.

use crate::quantity::Unit;

/// How many digits of a number are shown. Noughts at the end of the decimals are never shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Rounding {
    /// So many decimals at most.
    Decimals(usize),
    /// So many significant digits, but never more than `most_decimals`, and never rounded left of the decimal mark.
    Significant {
        /// Significant digits.
        digits: u32,
        /// Decimals at most.
        most_decimals: usize,
    },
    /// Every digit of the number.
    Exact,
}

/// `value` as text: rounded, grouped in thousands, with a true minus sign. A value which is not nought never shows as
/// nought: it keeps its first digit.
pub fn number(value: f64, rounding: Rounding) -> String {
    if !value.is_finite() {
        return "–".to_owned();
    }
    let plain = match rounding {
        Rounding::Exact => format!("{}", value.abs()),
        Rounding::Decimals(decimals) => fixed(value.abs(), decimals),
        Rounding::Significant {
            digits,
            most_decimals,
        } => fixed(
            value.abs(),
            decimals_for(value.abs(), digits).min(most_decimals),
        ),
    };
    punctuate(value < 0.0, &plain)
}

/// Relative allowance which lifts a tie (`3.125` at two decimals) over the last bit, so that it is rounded away from nought
/// as people do it.
const TIE: f64 = 1e-12;

/// Decimals beyond which no number is shown.
const MOST_DECIMALS: usize = 15;

/// `size`, not negative, at `decimals`, or at the first digit which is not nought.
fn fixed(size: f64, decimals: usize) -> String {
    let lifted = size * (1.0 + TIE);
    (decimals..=MOST_DECIMALS)
        .map(|decimals| format!("{lifted:.decimals$}"))
        .find(|text| size <= 0.0 || text.bytes().any(|digit| (b'1'..=b'9').contains(&digit)))
        .unwrap_or_else(|| "0".to_owned())
}

/// Decimals which give `size` its significant `digits`.
fn decimals_for(size: f64, digits: u32) -> usize {
    let wanted = (1..digits).fold(1.0, |power, _| power * 10.0);
    let mut scaled = size * (1.0 + TIE);
    let mut decimals = 0;
    while scaled < wanted && decimals < MOST_DECIMALS {
        scaled *= 10.0;
        decimals += 1;
    }
    decimals
}

/// The digits of `plain` in the format of the page: comma between thousands, point before the decimals.
fn punctuate(is_negative: bool, plain: &str) -> String {
    let (whole, decimals) = plain.split_once('.').unwrap_or((plain, ""));
    let decimals = decimals.trim_end_matches('0');
    let mut text = String::new();
    let is_nought = plain.bytes().all(|digit| matches!(digit, b'0' | b'.'));
    if is_negative && !is_nought {
        text.push('−');
    }
    for (position, digit) in whole.chars().enumerate() {
        if position > 0 && (whole.len() - position).is_multiple_of(3) {
            text.push(',');
        }
        text.push(digit);
    }
    if !decimals.is_empty() {
        text.push('.');
        text.push_str(decimals);
    }
    text
}

/// A number of things, grouped in thousands.
pub fn counted(count: usize) -> String {
    punctuate(false, &count.to_string())
}

/// `value` rounded as its unit asks, but never to less than it is: the lower end of a range.
pub fn number_not_below(value: f64, unit: Unit) -> String {
    towards(value, unit, f64::ceil)
}

/// `value` rounded as its unit asks, but never to more than it is: the upper end of a range.
pub fn number_not_above(value: f64, unit: Unit) -> String {
    towards(value, unit, f64::floor)
}

fn towards(value: f64, unit: Unit, whole: fn(f64) -> f64) -> String {
    let decimals = match rounding(unit, value) {
        Rounding::Exact => return number(value, Rounding::Exact),
        Rounding::Decimals(decimals) => decimals,
        Rounding::Significant {
            digits,
            most_decimals,
        } => decimals_for(value.abs(), digits).min(most_decimals),
    };
    let scale = (0..decimals).fold(1.0, |scale, _| scale * 10.0);
    let scaled = value * scale;
    // A limit which is a round number but for its last bit stays that number.
    let near = scaled.round();
    let kept = if (scaled - near).abs() <= near.abs().max(1.0) * TIE {
        near
    } else {
        whole(scaled)
    };
    number(kept / scale, Rounding::Decimals(decimals))
}

/// How a value of `number` in `unit` is rounded for show.
pub fn rounding(unit: Unit, number: f64) -> Rounding {
    let digits = |digits, most_decimals| Rounding::Significant {
        digits,
        most_decimals,
    };
    let whole_above = |limit: f64| Rounding::Decimals(usize::from(number.abs() < limit));
    match unit {
        Unit::Ampere | Unit::Kiloampere | Unit::Volt | Unit::Kilovolt => digits(3, 2),
        Unit::Watt | Unit::VoltAmpere | Unit::Millimetre => whole_above(10.0),
        Unit::Kilowatt | Unit::Horsepower | Unit::KilovoltAmpere | Unit::MegavoltAmpere => {
            digits(3, 2)
        }
        Unit::OhmPerKilometre | Unit::OhmPerThousandFeet => digits(3, 4),
        Unit::Henry => digits(3, 6),
        Unit::Millihenry => digits(3, 3),
        Unit::Microhenry | Unit::Hertz => digits(3, 1),
        Unit::Metre | Unit::Centimetre | Unit::Foot | Unit::Inch => digits(3, 2),
        Unit::SquareMetre | Unit::SquareFoot => digits(3, 2),
        Unit::SquareMillimetre | Unit::ThousandCircularMils => digits(3, 2),
        Unit::CircularMil => Rounding::Decimals(0),
        Unit::Celsius | Unit::Fahrenheit | Unit::Kelvin => Rounding::Decimals(1),
        Unit::KelvinDifference | Unit::FahrenheitDifference => Rounding::Decimals(1),
        Unit::WattPerSquareMetreKelvin | Unit::WattPerKelvin => digits(3, 2),
        Unit::Pascal | Unit::JoulePerKilogramKelvin => Rounding::Decimals(0),
        Unit::Kilopascal => digits(4, 2),
        Unit::KilogramPerCubicMetre => Rounding::Decimals(3),
        Unit::CubicMetrePerSecond => digits(3, 4),
        Unit::CubicMetrePerHour | Unit::CubicFootPerMinute => whole_above(100.0),
        Unit::MetrePerOhm | Unit::FootPerOhm => Rounding::Decimals(0),
        Unit::One => digits(4, 6),
        Unit::PerCent => digits(3, 2),
    }
}
