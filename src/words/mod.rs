//! Every sentence, label, unit symbol and number format shown.
//!
//! Here: text, and numbers as text. Not here: decisions, or arithmetic beyond the conversion of units and rounding for
//! show. All text is English. The names of fields and choices, findings, refusals and cautions each come from a `match`
//! without a catch-all, so that a missing one does not compile. Titles of rules and meanings of symbols go by a text, and
//! so need a catch-all; tests ask for each of them. A second language would be a second arm beside each. Start with
//! [`label`], [`amount`] and [`page`].

mod cautions;
mod entries;
mod formulas;
mod labels;
mod notes;
pub mod numbers;
mod outcomes;
pub mod page;
mod refusals;
mod rules;
mod sentences;
mod units;
mod working;

pub use cautions::{CautionWords, caution, caution_line};
pub use entries::{
    AssumptionLine, accepted, amount_of_field, amount_of_field_with_unit, assumed,
    assumed_with_unit, assumption_lines, assumption_reason, entry, entry_to_edit, entry_with_unit,
};
pub use labels::{
    choice, grade, grade_meaning, head, ink, known, label, label_in_run, ledger_group, limit, run,
    run_field, run_where, total, verdict,
};
pub use notes::{NoteWords, memory_table, note, place, place_in_full, reactor_reason};
pub use outcomes::{
    TotalWords, branch_device, decided_by, installed, metal, reactor, size_found, total_words,
};
pub use refusals::{entry_refusal, file_refusal};
pub use rules::{rule_title, symbol_for};
pub use sentences::{
    Piece, assumed_in_sentence, enclosure_sentence, entry_in_sentence, fields, gap, in_sentence,
    incoming_sentence, main_sentence, supply_sentence, title_block,
};
pub use units::{
    amount, amount_in, apart, bare, bare_in, device, device_type, field_symbol, field_unit,
    quantities_apart, quantity, sets, size, unit_for_value, unit_of, unit_symbol, whole, with_unit,
};
pub use working::{
    TermLine, WorkingLine, figure, source_in_full, source_line, source_name, working, working_flat,
    working_line,
};
