//! Values as they are shown: text, ink, and how a screen reader says both.

use super::markup::tag;
use super::spot::Traced;
use crate::assume::Assumption;
use crate::quantity::{Kind, Unit};
use crate::sheet::{Drafts, Entry, Record, UnitSystem};
use crate::words::{self, page};
use crate::working::{Amount, Grade, Ink, MarginNote, Origin, Place};
use leptos::prelude::*;

/// What stands at a place.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Shown {
    /// A text which was typed and not taken.
    Refused(String),
    /// A value in its ink.
    Value(Ink, String),
    /// Nothing.
    Nothing,
}

impl Shown {
    /// The text, empty where nothing stands.
    pub(super) fn text(&self) -> &str {
        match self {
            Shown::Refused(text) | Shown::Value(_, text) => text,
            Shown::Nothing => "",
        }
    }

    /// The class which gives the text its ink.
    pub(super) const fn class(&self) -> &'static str {
        match self {
            Shown::Refused(_) => "refused",
            Shown::Value(ink, _) => ink_class(*ink),
            Shown::Nothing => "nothing",
        }
    }

    /// What a screen reader adds to the text: the ink, where it is not that of worked values.
    pub(super) const fn spoken(&self) -> &'static str {
        match self {
            Shown::Refused(_) => page::refused_label(),
            Shown::Value(Ink::Worked, _) | Shown::Nothing => "",
            Shown::Value(ink, _) => words::ink(*ink),
        }
    }

    /// The text of which a typed change starts: what the person typed, never what was filled in.
    pub(super) fn typed(&self) -> &str {
        match self {
            Shown::Refused(text) | Shown::Value(Ink::Entered, text) => text,
            Shown::Value(..) | Shown::Nothing => "",
        }
    }
}

/// The class of an ink.
pub(super) const fn ink_class(ink: Ink) -> &'static str {
    match ink {
        Ink::Entered => "entered",
        Ink::Assumed => "assumed",
        Ink::Worked => "worked",
    }
}

/// What a place holds and what stands in for it: the parts of which [`Shown`] is made.
#[derive(Clone, Copy)]
pub(super) struct Holding<'a> {
    /// What was entered for its holder, where the holder is there.
    pub(super) record: Option<&'a Record>,
    /// What was refused, of this holder at least.
    pub(super) drafts: &'a Drafts,
    /// What was assumed, for this holder at least.
    pub(super) assumptions: &'a [Assumption],
    /// The units.
    pub(super) system: UnitSystem,
}

/// How a value is written.
#[derive(Clone, Copy, PartialEq, Eq)]
pub(super) enum Writing {
    /// Without its unit, which stands in the head or behind the field.
    Bare,
    /// With its unit.
    WithUnit,
    /// As a part of its sentence.
    InSentence,
}

impl Holding<'_> {
    /// What stands at `place`, with `worked` where nothing was entered but a value follows from others.
    pub(super) fn at(self, place: Place, worked: Option<&Traced>, writing: Writing) -> Shown {
        match self.drafts.get(&place) {
            Some(draft) => Shown::Refused(draft.clone()),
            None => self.counting(place, worked, writing),
        }
    }

    /// As [`Holding::at`], but what counts: texts which were refused count for nothing.
    pub(super) fn counting(self, place: Place, worked: Option<&Traced>, writing: Writing) -> Shown {
        let field = place.field;
        if let Some(entered) = self.record.and_then(|record| record.get(field)) {
            return Shown::Value(Ink::Entered, self.entered(place, entered, writing));
        }
        if let Some(traced) = worked {
            let text = match writing {
                Writing::Bare => words::amount_of_field(field, traced.amount, self.system),
                _ => words::amount_of_field_with_unit(field, traced.amount, self.system),
            };
            return Shown::Value(traced.ink(), text);
        }
        let assumed = self.assumptions.iter().find(|known| known.place == place);
        match assumed {
            Some(known) => {
                let write = match writing {
                    Writing::Bare => words::assumed,
                    Writing::WithUnit => words::assumed_with_unit,
                    Writing::InSentence => words::assumed_in_sentence,
                };
                Shown::Value(Ink::Assumed, write(field, &known.value, self.system))
            }
            None => Shown::Nothing,
        }
    }

    fn entered(self, place: Place, entered: &Entry, writing: Writing) -> String {
        let write = match writing {
            Writing::Bare => words::entry,
            Writing::WithUnit => words::entry_with_unit,
            Writing::InSentence => words::entry_in_sentence,
        };
        write(place.field, entered, self.system)
    }
}

/// The text of a worked value with its unit.
pub(super) fn text_with_unit(traced: &Traced, system: UnitSystem) -> String {
    match &traced.origin {
        Origin::Figure(figure) => words::figure(figure, system),
        _ => words::amount(traced.amount, system),
    }
}

/// The text of a worked value without its unit, which stands in the head; shares in per cent.
pub(super) fn bare_text(amount: Amount, system: UnitSystem) -> String {
    match amount {
        Amount::Measured {
            si,
            kind: Kind::Ratio,
        } => words::bare_in(si, Unit::PerCent),
        amount => words::bare(amount, system),
    }
}

/// A worked value in its ink, without its unit.
pub(super) fn bare(traced: &Traced, system: UnitSystem) -> Shown {
    Shown::Value(traced.ink(), bare_text(traced.amount, system))
}

/// The mark of a grade: its shape and its word, the same in the row, in the margin and in print.
pub(super) fn grade_mark(grade: Grade) -> AnyView {
    mark(grade_class(grade), words::grade(grade))
}

/// A mark: a shape, which its class gives, and a word.
pub(super) fn mark(class: &'static str, word: &'static str) -> AnyView {
    tag("SPAN")
        .class(class)
        .with(tag("I").set("aria-hidden", "true"))
        .text(word)
        .done()
}

/// The class of a grade's mark.
pub(super) const fn grade_class(grade: Grade) -> &'static str {
    match grade {
        Grade::Stop => "mark stop",
        Grade::Query => "mark query",
        Grade::Note => "mark note",
    }
}

/// The grades among notes, each once, gravest first.
pub(super) fn grades<'a>(notes: impl Iterator<Item = &'a MarginNote>) -> Vec<Grade> {
    let mut grades: Vec<Grade> = notes.map(|note| note.grade).collect();
    grades.sort();
    grades.dedup();
    grades
}
