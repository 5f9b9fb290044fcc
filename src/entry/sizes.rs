//! Conductor sizes as typed: `2`, `#2`, `1/0 AWG`, `250 kcmil`.

use super::Refusal;
use super::numeral::{Numeral, Value};
use super::units::Spelling;
use crate::math;
use crate::quantity::{Unit, WireSize};

/// What the number of a size counts.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Scale {
    Gauge,
    Kcmil,
    SquareMillimetres,
}

/// The size which `text` names.
pub(super) fn size(text: &str) -> Result<WireSize, Refusal> {
    let small = text.to_lowercase();
    let number_on = small
        .trim_start_matches(['#', ' '])
        .trim_start_matches("awg")
        .trim_start_matches(['#', ' ']);
    let has_prefix = number_on.len() < small.len();
    let end = number_on
        .find(|part: char| !(part.is_ascii_digit() || matches!(part, '/' | '.' | ',')))
        .unwrap_or(number_on.len());
    let (number, unit) = number_on.split_at_checked(end).unwrap_or((number_on, ""));
    let unknown = || Refusal::UnknownSize {
        text: text.to_owned(),
        smaller: None,
        larger: None,
    };
    let scale = match scale(unit.trim()) {
        Ok(None) if has_prefix => Some(Scale::Gauge),
        Ok(scale) => scale,
        Err(()) => return Err(unknown()),
    };
    if scale == Some(Scale::SquareMillimetres) {
        let area = circular_mils_of_metric(number).ok_or_else(unknown)?;
        return Err(Refusal::MetricSize {
            text: text.to_owned(),
            larger: next_larger(area),
        });
    }
    if let Some(size) = WireSize::from_number(usual(number)).filter(|size| fits(*size, scale)) {
        return Ok(size);
    }
    let area = circular_mils(number, scale).ok_or_else(unknown)?;
    Err(Refusal::UnknownSize {
        text: text.to_owned(),
        smaller: next_smaller(area),
        larger: next_larger(area),
    })
}

fn scale(unit: &str) -> Result<Option<Scale>, ()> {
    let spelling = Spelling::of(unit);
    match unit {
        "" => Ok(None),
        "awg" | "ga" | "gauge" => Ok(Some(Scale::Gauge)),
        _ if spelling.means(Unit::ThousandCircularMils) => Ok(Some(Scale::Kcmil)),
        _ if spelling.means(Unit::SquareMillimetre) => Ok(Some(Scale::SquareMillimetres)),
        _ => Err(()),
    }
}

/// Noughts may be written out: `00` is `2/0`.
fn usual(number: &str) -> &str {
    match number {
        "0" => "1/0",
        "00" => "2/0",
        "000" => "3/0",
        "0000" => "4/0",
        other => other,
    }
}

fn fits(size: WireSize, scale: Option<Scale>) -> bool {
    match scale {
        None => true,
        Some(scale) => size.is_gauge() == (scale == Scale::Gauge),
    }
}

/// The area which a number would have on its scale, were such a conductor made. Without a unit, numbers above all gauges
/// count thousands of circular mils.
fn circular_mils(number: &str, scale: Option<Scale>) -> Option<f64> {
    const THINNEST_GAUGE: f64 = 40.0;
    if let Some(noughts) = number.strip_suffix("/0") {
        let noughts: u8 = noughts.parse().ok()?;
        return (scale != Some(Scale::Kcmil)).then(|| area_of_gauge(1.0 - f64::from(noughts)));
    }
    let number = f64::from(number.parse::<u16>().ok()?);
    match scale {
        Some(Scale::Gauge) => Some(area_of_gauge(number)),
        None if number <= THINNEST_GAUGE => Some(area_of_gauge(number)),
        _ => Some(number * 1000.0),
    }
}

/// Circular mils of gauge `number`, where `1/0` is nought and `2/0` is -1.
///
/// The gauge is drawn in 39 equal ratios from 36 (0.005 in) to 4/0 (0.46 in): A = 25 · 92^((36 − n) / 19.5).
/// Only near sizes are found with it; the tables hold their own areas.
fn area_of_gauge(number: f64) -> f64 {
    25.0 * math::power(92.0, (36.0 - number) / 19.5)
}

fn circular_mils_of_metric(number: &str) -> Option<f64> {
    let (numeral, rest) = Numeral::split_from(number)?;
    match numeral.value()? {
        Value::Sure(area) if rest.is_empty() => {
            Some(Unit::CircularMil.from_si(Unit::SquareMillimetre.to_si(area)))
        }
        _ => None,
    }
}

fn next_larger(circular_mils: f64) -> Option<WireSize> {
    WireSize::ALL
        .into_iter()
        .find(|size| math::reaches(area(*size), circular_mils))
}

fn next_smaller(circular_mils: f64) -> Option<WireSize> {
    WireSize::ALL
        .into_iter()
        .rev()
        .find(|size| area(*size) < circular_mils)
}

fn area(size: WireSize) -> f64 {
    let scale = if size.is_gauge() {
        Scale::Gauge
    } else {
        Scale::Kcmil
    };
    // Every size has a number which is read here.
    circular_mils(size.number(), Some(scale)).unwrap_or_default()
}
