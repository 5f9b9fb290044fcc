//! The few functions of mathematics which the core needs beyond `+ - * / sqrt`.
//!
//! Here: powers (through `libm`, so that the page and a native program give the same digits), and comparison with the
//! allowance for rounding. Not here: units, domain words.

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
