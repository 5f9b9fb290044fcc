//! The sheet: what the person enters and what is saved. Plain data, edits, and history.
//!
//! Here: fields with their shapes and ranges ([`spec()`]), entries, the sheet, its document with drafts and answers,
//! edits and undo. Not here: results, parsing of typed text (`entry`), the saved format (`file`).
//! Start with [`Sheet`].

mod choice;
mod document;
mod entries;
mod history;
mod spec;

pub use choice::Choice;
pub use document::{Answers, Document, Drafts, Edit, NoteRef};
pub use entries::{Entry, Impossible, Measured, Record};
pub use history::{History, Step};
pub use spec::{Home, MEASURES, Shape, Spec, UnitSystem, fields_of, home, spec};

use crate::working::{Holder, HolderId, Place};
use std::sync::Arc;

/// Feeders a sheet may hold.
pub const MOST_FEEDERS: usize = 2_000;
/// Other heat sources a sheet may hold.
pub const MOST_SOURCES: usize = 200;
/// Characters which a text may hold where its field sets no narrower limit.
pub const LONGEST_TEXT: usize = 2_000;
/// Characters of a refused text, and of an answer, which are kept. Far above what a field takes: reached only by
/// pasting a whole page into a cell.
pub const LONGEST_DRAFT: usize = 10_000;

/// One feeder, or one other source of heat: an identity and what was entered for it.
#[derive(Debug, Clone, PartialEq)]
pub struct Item {
    /// Names the item for as long as the sheet lives.
    pub id: HolderId,
    /// What was entered.
    pub record: Record,
}

/// One panel on one supply, its feeders, its enclosure: only what was entered.
///
/// Items are shared, so that one more step of history costs one item and some pointers.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Sheet {
    /// Title, supply, incoming run, main device, enclosure.
    pub record: Record,
    /// The feeders in their order.
    pub feeders: Vec<Arc<Item>>,
    /// Other sources of heat in their order.
    pub sources: Vec<Arc<Item>>,
    /// The next identity to be given out.
    pub next_id: u32,
}

impl Sheet {
    /// What was entered for `holder`; `None` where the holder is gone.
    pub fn record(&self, holder: Holder) -> Option<&Record> {
        match holder {
            Holder::Sheet => Some(&self.record),
            Holder::Feeder(id) => find(&self.feeders, id),
            Holder::Source(id) => find(&self.sources, id),
        }
    }

    /// Whether the place exists: its holder is there, and is of the kind which has the field.
    pub fn has(&self, place: Place) -> bool {
        let of_holder = match place.holder {
            Holder::Sheet => Home::Sheet,
            Holder::Feeder(_) => Home::Feeder,
            Holder::Source(_) => Home::Source,
        };
        home(place.field) == of_holder && self.record(place.holder).is_some()
    }

    /// Whether nothing at all was entered.
    pub fn is_empty(&self) -> bool {
        self.record.is_empty() && self.feeders.is_empty() && self.sources.is_empty()
    }
}

fn find(items: &[Arc<Item>], id: HolderId) -> Option<&Record> {
    items
        .iter()
        .find(|item| item.id == id)
        .map(|item| &item.record)
}
