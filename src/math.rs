//! The few functions of mathematics which the core needs beyond `+ - * / sqrt`.
//!
//! Here: powers (through `libm`, so that the page and a native program give the same digits), comparison with the
//! allowance for rounding, and a root finder which brackets. Not here: units, domain words.

/// Relative allowance in comparisons with printed table values, so that a product which is meant to equal an entry
/// is not pushed to the next one by the last bit.
pub const COMPARISON_ALLOWANCE: f64 = 1e-9;

/// `base` to the power `exponent`, equal on every target.
pub fn power(base: f64, exponent: f64) -> f64 {
    libm::pow(base, exponent)
}

/// Whether `value` reaches `required`, with [`COMPARISON_ALLOWANCE`].
pub fn reaches(value: f64, required: f64) -> bool {
    value >= required - required.abs() * COMPARISON_ALLOWANCE
}

/// Whether two numbers are the same but for [`COMPARISON_ALLOWANCE`].
pub fn agree(a: f64, b: f64) -> bool {
    reaches(a, b) && reaches(b, a)
}

/// Where a falling step function crosses the line `y = x`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Crossing {
    /// The largest `x` tried for which the function still lay above `x`.
    pub below: f64,
    /// The smallest `x` tried for which the function lay at or under `x`: the side which is kept.
    pub above: f64,
    /// How many times the bracket was halved.
    pub turns: u32,
}

/// Halves the bracket `low..high` until it is no wider than `tolerance`, for a function which never rises.
///
/// Needs `f(low) > low` and `f(high) <= high`, else `None`. At most 200 turns, far more than a bracket of doubles needs.
pub fn crossing_of_falling(
    low: f64,
    high: f64,
    tolerance: f64,
    mut f: impl FnMut(f64) -> f64,
) -> Option<Crossing> {
    if f(low) <= low || f(high) > high {
        return None;
    }
    let mut found = Crossing {
        below: low,
        above: high,
        turns: 0,
    };
    while found.above - found.below > tolerance && found.turns < 200 {
        let middle = 0.5 * (found.below + found.above);
        if f(middle) > middle {
            found.below = middle;
        } else {
            found.above = middle;
        }
        found.turns += 1;
    }
    Some(found)
}
