//! The one signal that changes, what follows from it, and the commands which change it.
//!
//! Here: [`Page`], handed to every component. Not here: markup, and where the sheet is kept ([`super::keep`]).

use super::bar::Message;
use super::conditions::Group;
use super::grid::{Cell, Editing};
use super::keep::Keeping;
use super::names;
use super::notes::Notes;
use super::shared::Shared;
use super::spot::Spot;
use crate::browser::page as window;
use crate::entry;
use crate::sheet::{Answers, Choice, Document, Edit, History, Sheet, UnitSystem};
use crate::words::{self, page};
use crate::work::{self, Worked};
use crate::working::{Field, HolderId, Place};
use leptos::prelude::*;
use std::collections::BTreeMap;

/// Everything a component may need. `history` is the only state of the sheet; the rest follows from it, or is a matter
/// of looking: what is open, what is read, what is said.
#[derive(Clone, Copy)]
pub(super) struct Page {
    /// The document with its past.
    pub(super) history: RwSignal<History>,
    /// The sheet, worked.
    pub(super) worked: Memo<Shared<Worked>>,
    /// All margin notes, gravest first, those of refused texts among them.
    pub(super) notes: Memo<Shared<Notes>>,
    /// What the feeders and sources are called.
    pub(super) names: Memo<BTreeMap<HolderId, String>>,
    /// What was answered.
    pub(super) answers: Memo<Answers>,
    /// What is under the cursor.
    pub(super) spot: RwSignal<Option<Spot>>,
    /// What is pinned in the working strip.
    pub(super) pinned: RwSignal<Option<Spot>>,
    /// Whether the working strip shows the whole chain.
    pub(super) is_chain_open: RwSignal<bool>,
    /// The cell on which the mouse went down while it had the focus.
    pub(super) pressed: StoredValue<Option<Cell>>,
    /// The feeder whose form is open.
    pub(super) form: RwSignal<Option<HolderId>>,
    /// The group of sentences which is open as a list.
    pub(super) group: RwSignal<Option<Group>>,
    /// The cell of the feeder list which Tab reaches.
    pub(super) cursor: RwSignal<Option<Cell>>,
    /// The cell of the feeder list which is being edited.
    pub(super) editing: RwSignal<Option<Editing>>,
    /// The message under the bar.
    pub(super) message: RwSignal<Option<Message>>,
    /// The margin note gone to last, by its id.
    pub(super) note: RwSignal<Option<String>>,
    /// Whether the margin is open on a narrow screen.
    pub(super) is_margin_open: RwSignal<bool>,
    /// What the live region says.
    pub(super) aloud: RwSignal<String>,
    /// Where the sheet is kept.
    pub(super) keeping: Keeping,
}

/// What became of a typed text.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Taken {
    /// It stands in its field now, or emptied it.
    Taken,
    /// It is kept beside its field; this says why it was refused.
    Refused(String),
}

impl Page {
    /// A page which starts at what the browser kept.
    pub(super) fn start() -> Self {
        let (keeping, document) = Keeping::start();
        let history = RwSignal::new(History::starting_at(document));
        let worked = Memo::new(move |before: Option<&Shared<Worked>>| {
            history.with(|history| work_through(&history.now().sheet, before))
        });
        let notes = Memo::new(move |_| {
            let mut notes = history.with(|history| history.now().draft_notes());
            notes.extend(worked.with(|worked| worked.notes.clone()));
            Shared::new(Notes::new(notes))
        });
        Self {
            history,
            worked,
            notes,
            names: Memo::new(move |_| history.with(|history| names::all(history.now()))),
            answers: Memo::new(move |_| history.with(|history| history.now().answers.clone())),
            spot: RwSignal::new(None),
            pinned: RwSignal::new(None),
            is_chain_open: RwSignal::new(false),
            pressed: StoredValue::new(None),
            form: RwSignal::new(None),
            group: RwSignal::new(None),
            cursor: RwSignal::new(None),
            editing: RwSignal::new(None),
            message: RwSignal::new(None),
            note: RwSignal::new(None),
            is_margin_open: RwSignal::new(false),
            aloud: RwSignal::new(String::new()),
            keeping,
        }
    }

    /// Reads the document, and follows its changes.
    pub(super) fn with<T>(self, read: impl FnOnce(&Document) -> T) -> T {
        self.history.with(|history| read(history.now()))
    }

    /// The units in which the sheet is read.
    pub(super) fn system(self) -> UnitSystem {
        self.with(|document| units(&document.sheet))
    }

    /// Reads the document as it is now.
    pub(super) fn peek<T>(self, read: impl FnOnce(&Document) -> T) -> T {
        self.history.with_untracked(|history| read(history.now()))
    }

    /// Does an edit; gives whether anything changed.
    pub(super) fn edit(self, edit: Edit) -> bool {
        self.change(|history| history.edit(edit))
    }

    /// Takes the last edit back.
    pub(super) fn undo(self) {
        let edit = self
            .history
            .with_untracked(|history| history.undoable().cloned());
        if matches!(edit, Some(Edit::Replace(_))) {
            self.keeping.is_back();
        }
        // Named by the document it leads to: there a deleted feeder has its tag again.
        self.change_and_say(History::undo, edit, page::undone, page::nothing_to_undo());
    }

    /// Does again what was taken back last.
    pub(super) fn redo(self) {
        let edit = self
            .history
            .with_untracked(|history| history.redoable().cloned());
        if matches!(edit, Some(Edit::Replace(_))) {
            self.peek(|document| self.keeping.is_replaced(document));
        }
        self.change_and_say(History::redo, edit, page::redone, page::nothing_to_redo());
    }

    /// Puts a whole other document in place of this one; undo brings this one back.
    pub(super) fn replace(self, document: Document) {
        self.form.set(None);
        self.group.set(None);
        self.pinned.set(None);
        self.spot.set(None);
        self.editing.set(None);
        self.cursor.set(None);
        self.peek(|document| self.keeping.is_replaced(document));
        self.edit(Edit::Replace(Box::new(document)));
    }

    /// Takes a typed text for a place, or keeps it beside the place and says why it was refused.
    pub(super) fn enter(self, place: Place, text: &str) -> Taken {
        let system = untrack(|| self.system());
        self.keeping.forget_typing();
        match entry::read(place.field, system, text) {
            Ok(Some(entry)) => {
                self.edit(Edit::Set(place, entry));
                Taken::Taken
            }
            Ok(None) => {
                self.edit(Edit::Clear(place));
                Taken::Taken
            }
            Err(refusal) => {
                self.edit(Edit::Refuse(place, text.to_owned()));
                let why = words::entry_refusal(&refusal);
                self.say(page::refused(words::label(place.field), &why));
                Taken::Refused(why)
            }
        }
    }

    /// Says something in the live region.
    pub(super) fn say(self, text: String) {
        self.aloud.set(text);
    }

    fn change_and_say(
        self,
        change: impl FnOnce(&mut History) -> bool,
        edit: Option<Edit>,
        said: fn(&str) -> String,
        nothing: &'static str,
    ) {
        // Said last, since what was done matters more than what came of it.
        match edit {
            Some(edit) if self.change(change) => {
                self.say(said(&self.peek(|document| names::edit(&edit, document))));
            }
            _ => self.say(nothing.to_owned()),
        }
    }

    fn change(self, change: impl FnOnce(&mut History) -> bool) -> bool {
        let before = self.notes.with_untracked(|notes| notes.counts());
        let has_changed = self
            .history
            .try_maybe_update(|history| {
                let has_changed = change(history);
                (has_changed, has_changed)
            })
            .unwrap_or(false);
        if has_changed {
            self.peek(|document| {
                self.keeping.keep(document);
                window::set_title(&names::title(document));
            });
            let after = self.notes.with_untracked(|notes| notes.counts());
            if after != before {
                self.say(page::announced(&after));
            }
        }
        has_changed
    }
}

fn work_through(sheet: &Sheet, before: Option<&Shared<Worked>>) -> Shared<Worked> {
    Shared::new(match before {
        Some(before) => work::work_again(sheet, before),
        None => work::work_out(sheet),
    })
}

fn units(sheet: &Sheet) -> UnitSystem {
    match sheet.record.choice(Field::Units) {
        Some(Choice::Si) => UnitSystem::Si,
        _ => UnitSystem::Us,
    }
}
