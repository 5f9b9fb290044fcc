//! How a number explains itself: rules and their sources, figures with their terms, findings for the margin.
//!
//! Here: [`Rule`], [`Figure`], [`Term`], [`Given`], the places of a sheet, margin notes and cautions as data.
//! Not here: formulas, tables, sentences. Start with [`Figure`].

mod amount;
mod notes;
mod place;
pub mod sources;

pub use amount::{Amount, Figure, Given, Ink, Origin, Term, sum_of_terms};
pub use notes::{Caution, Grade, MarginNote, MemoryTable, NoteKind, ReactorReason};
pub use place::{Field, Holder, HolderId, Place, Run, RunField};

/// How well a rule or a table cell is known. Ordered from best to least.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Known {
    /// Follows from physics or arithmetic; nothing has to be looked up.
    Derived,
    /// Read in two publications which agree.
    CrossChecked,
    /// Read in one publication.
    Read,
    /// A fact of the trade without a source.
    CommonPractice,
    /// Recalled, no page could be read: it decides nothing silently.
    FromMemory,
}

/// A standard, textbook or other publication.
#[derive(Debug, PartialEq, Eq)]
pub struct Source {
    /// Short name as the trade writes it: `NEC`, `UL 508A`.
    pub name: &'static str,
    /// Year or edition.
    pub edition: &'static str,
    /// Full title.
    pub title: &'static str,
}

/// What a rule does with its terms.
#[derive(Debug, PartialEq, Eq)]
pub enum Form {
    /// An expression in plain ASCII over the symbols, valid in SI units. The tests evaluate it.
    Formula {
        /// The right-hand side, `P / (k * A)`.
        expression: &'static str,
        /// The symbols of the expression, in the order of the terms.
        symbols: &'static [&'static str],
    },
    /// The sum of all terms, however many.
    Sum,
    /// A value taken from a published table.
    Lookup,
    /// A choice among values by comparison.
    Choice,
}

/// One rule: what it gives, how, and by whose authority.
#[derive(Debug, PartialEq, Eq)]
pub struct Rule {
    /// `room.subject.rule`, unique.
    pub id: &'static str,
    /// The symbol of the result.
    pub gives: &'static str,
    /// Formula, table or choice.
    pub form: Form,
    /// The publication.
    pub source: &'static Source,
    /// Clause, table or page in it.
    pub clause: &'static str,
    /// How well it is known.
    pub known: Known,
}

impl Rule {
    /// The figure of `value` by this rule from `terms`, in worked ink.
    pub fn figure(&'static self, value: impl Into<Amount>, terms: impl Into<Vec<Term>>) -> Figure {
        Figure {
            rule: self,
            value: value.into(),
            terms: terms.into(),
            ink: Ink::Worked,
        }
    }

    /// As [`Rule::figure`], for a value which fills a gap until somebody types it.
    pub fn assumed_figure(
        &'static self,
        value: impl Into<Amount>,
        terms: impl Into<Vec<Term>>,
    ) -> Figure {
        Figure {
            ink: Ink::Assumed,
            ..self.figure(value, terms)
        }
    }
}
