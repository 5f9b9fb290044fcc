//! Every sentence, label, unit symbol and number format shown.
//!
//! Here: text, and numbers as text. Not here: decisions, or arithmetic beyond the conversion of units and rounding for
//! show. Start with [`page`] for fixed texts.

pub mod page;
