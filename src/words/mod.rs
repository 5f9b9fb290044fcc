//! Every sentence, label, unit symbol and number format shown.
//!
//! Here: text, and numbers as text. Not here: decisions, or arithmetic beyond the conversion of units and rounding for
//! show. All text is English, and every function which gives text is a `match` without a catch-all, so that a missing
//! sentence does not compile; a second language would be a second arm beside each. Start with [`label`], [`amount`] and
//! [`page`].

mod entries;
mod labels;
pub mod numbers;
pub mod page;
mod units;

pub use entries::{
    amount_of_field, amount_of_field_with_unit, assumed, assumed_with_unit, assumption_reason,
    entry, entry_with_unit,
};
pub use labels::{
    choice, grade, grade_meaning, head, ink, known, label, ledger_group, limit, run, run_field,
    total, verdict,
};
pub use units::{
    amount, amount_in, apart, bare, bare_in, device, device_type, field_symbol, field_unit,
    quantities_apart, quantity, sets, size, unit_for_value, unit_of, unit_symbol, whole, with_unit,
};
