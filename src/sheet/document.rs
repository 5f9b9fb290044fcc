//! The person's document around the sheet: drafts which were refused, answers to margin notes, and edits.

use super::{Entry, Home, Item, LONGEST_DRAFT, MOST_FEEDERS, MOST_SOURCES, Record, Sheet, home};
use crate::working::{Field, Grade, Holder, HolderId, MarginNote, NoteKind, Place};
use std::collections::BTreeMap;
use std::sync::Arc;

/// Texts which were typed and refused, by place. The core never sees them.
pub type Drafts = BTreeMap<Place, String>;

/// Names a margin note: what it says, and where.
#[derive(Debug, Clone, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct NoteRef {
    /// Where.
    pub place: Place,
    /// [`NoteKind::id`].
    pub kind: String,
}

/// Answers to margin notes.
pub type Answers = BTreeMap<NoteRef, String>;

/// A sheet with what belongs to it but is not worked: drafts and answers.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Document {
    /// What was entered and taken.
    pub sheet: Sheet,
    /// What was typed and refused.
    pub drafts: Drafts,
    /// What was answered.
    pub answers: Answers,
}

/// One change to a document.
#[derive(Debug, Clone, PartialEq)]
pub enum Edit {
    /// Puts an entry into a place; a draft there goes.
    Set(Place, Entry),
    /// Empties a place; a draft there goes.
    Clear(Place),
    /// Keeps a refused text beside its place; the entry there stays.
    Refuse(Place, String),
    /// Adds an empty feeder after the one named, or at the end.
    AddFeeder {
        /// The feeder before it.
        after: Option<HolderId>,
    },
    /// Adds a copy of a feeder after it; drafts are not copied, the tag is left empty.
    DuplicateFeeder(HolderId),
    /// Removes a feeder.
    DeleteFeeder(HolderId),
    /// Moves a feeder up (true) or down by one row.
    MoveFeeder {
        /// Which.
        id: HolderId,
        /// Towards the head of the list.
        up: bool,
    },
    /// Adds an empty heat source at the end.
    AddSource,
    /// Removes a heat source.
    DeleteSource(HolderId),
    /// Answers a note; an empty answer takes the answer back.
    Answer(NoteRef, String),
    /// Puts a whole other document in place of this one.
    Replace(Box<Document>),
}

impl Document {
    /// The document after `edit`. An edit which finds nothing to change gives an equal document.
    pub fn after(&self, edit: &Edit) -> Document {
        let mut next = self.clone();
        match edit {
            Edit::Set(place, entry) => next.set(*place, entry),
            Edit::Clear(place) => next.clear(*place),
            Edit::Refuse(place, text) => {
                if next.sheet.has(*place) {
                    next.drafts.insert(*place, cut(text));
                }
            }
            Edit::AddFeeder { after } => next.add_feeder(*after, Record::default()),
            Edit::DuplicateFeeder(id) => next.duplicate(*id),
            Edit::DeleteFeeder(id) => {
                next.sheet.feeders.retain(|item| item.id != *id);
                next.forget(Holder::Feeder(*id));
            }
            Edit::MoveFeeder { id, up } => next.move_feeder(*id, *up),
            Edit::AddSource => {
                if next.sheet.sources.len() < MOST_SOURCES {
                    let id = next.new_id();
                    next.sheet.sources.push(Arc::new(Item {
                        id,
                        record: Record::default(),
                    }));
                }
            }
            Edit::DeleteSource(id) => {
                next.sheet.sources.retain(|item| item.id != *id);
                next.forget(Holder::Source(*id));
            }
            Edit::Answer(note, text) => {
                if text.is_empty() {
                    next.answers.remove(note);
                } else if next.sheet.record(note.place.holder).is_some() {
                    next.answers.insert(note.clone(), cut(text));
                }
            }
            Edit::Replace(other) => next = (**other).clone(),
        }
        next
    }

    /// A margin note for each refused text, so that none is forgotten.
    pub fn draft_notes(&self) -> Vec<MarginNote> {
        self.drafts
            .iter()
            .map(|(place, text)| {
                MarginNote::new(
                    Grade::Query,
                    place.field,
                    NoteKind::DraftRefused { text: text.clone() },
                )
                .held_by(place.holder)
            })
            .collect()
    }

    fn set(&mut self, place: Place, entry: &Entry) {
        // An entry which does not fit its field changes nothing: `entry` has refused it before it comes here.
        if self.change(place, |record| {
            record.set(place.field, entry.clone()).is_ok()
        }) {
            self.drafts.remove(&place);
        }
    }

    fn clear(&mut self, place: Place) {
        self.change(place, |record| {
            record.clear(place.field);
            true
        });
        self.drafts.remove(&place);
    }

    fn change(&mut self, place: Place, edit: impl FnOnce(&mut Record) -> bool) -> bool {
        let (wanted, record) = match place.holder {
            Holder::Sheet => (Home::Sheet, Some(&mut self.sheet.record)),
            Holder::Feeder(id) => (Home::Feeder, find_mut(&mut self.sheet.feeders, id)),
            Holder::Source(id) => (Home::Source, find_mut(&mut self.sheet.sources, id)),
        };
        match record {
            Some(record) if home(place.field) == wanted => edit(record),
            _ => false,
        }
    }

    fn new_id(&mut self) -> HolderId {
        let id = HolderId(self.sheet.next_id);
        self.sheet.next_id = self.sheet.next_id.saturating_add(1);
        id
    }

    fn add_feeder(&mut self, after: Option<HolderId>, record: Record) {
        if self.sheet.feeders.len() >= MOST_FEEDERS {
            return;
        }
        let id = self.new_id();
        let at = after
            .and_then(|id| self.sheet.feeders.iter().position(|item| item.id == id))
            .map_or(self.sheet.feeders.len(), |position| position + 1);
        self.sheet.feeders.insert(at, Arc::new(Item { id, record }));
    }

    fn duplicate(&mut self, id: HolderId) {
        let Some(record) = self.sheet.record(Holder::Feeder(id)) else {
            return;
        };
        let mut copy = record.clone();
        copy.clear(Field::Tag);
        self.add_feeder(Some(id), copy);
    }

    fn move_feeder(&mut self, id: HolderId, up: bool) {
        let Some(from) = self.sheet.feeders.iter().position(|item| item.id == id) else {
            return;
        };
        let to = if up {
            from.checked_sub(1)
        } else {
            Some(from + 1)
        };
        if let Some(to) = to.filter(|to| *to < self.sheet.feeders.len()) {
            self.sheet.feeders.swap(from, to);
        }
    }

    fn forget(&mut self, holder: Holder) {
        self.drafts.retain(|place, _| place.holder != holder);
        self.answers.retain(|note, _| note.place.holder != holder);
    }
}

/// The text as far as it is kept, so that every document can be saved and opened again.
fn cut(text: &str) -> String {
    text.chars().take(LONGEST_DRAFT).collect()
}

fn find_mut(items: &mut [Arc<Item>], id: HolderId) -> Option<&mut Record> {
    items
        .iter_mut()
        .find(|item| item.id == id)
        .map(|item| &mut Arc::make_mut(item).record)
}
