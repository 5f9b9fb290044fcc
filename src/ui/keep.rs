//! Where the sheet is kept: in the browser's store at once, in a file when the person says so.
//!
//! The store is a net under the page, the file is the truth. Nothing kept is written over unseen: what another tab
//! wrote, or what could not be read, stays until the person has chosen.

use super::demos;
use crate::browser::panic::{self, Rescue};
use crate::browser::store::{self, NotKept};
use crate::browser::{clock, on_next_frame};
use crate::file;
use crate::sheet::{Document, Edit};
use crate::working::{Field, Holder, HolderId, Place};
use leptos::prelude::*;

/// The sheet in hand.
const SHEET: &str = "ventrail/1/sheet";
/// Who wrote the sheet last, and when.
const STAMP: &str = "ventrail/1/stamp";
/// How the keys begin under which tabs go on while another one has written the sheet; each tab has a key of its own.
const ASIDE: &str = "ventrail/1/aside";
/// The text which is being typed, with its place.
const TYPING: &str = "ventrail/1/typing";
/// In which file the sheet is.
const FILED: &str = "ventrail/1/filed";
/// Texts which could not be opened, and wait for the person.
const RESCUED: [&str; 4] = [
    "ventrail/1/rescued",
    "ventrail/1/rescued-2",
    "ventrail/1/rescued-3",
    "ventrail/1/rescued-4",
];
/// The sheet which another one replaced, where it is in no file: undo brings it back only while the tab is open.
const REPLACED: &str = "ventrail/1/replaced";
/// How often in a row the program stopped.
const STOPS: &str = "ventrail/1/stops";
/// Stops in a row after which the sheet is not opened again by itself.
const TOO_MANY_STOPS: u32 = 2;
/// How the kept name of a file begins while the sheet is the same as in the file.
const SAME: &str = "same ";
/// And how after it was changed.
const CHANGED: &str = "changed ";
/// Files which are remembered: undo comes back to what is in them, and each is a whole document.
const FILES_KNOWN: usize = 4;

/// What the notice after a panic offers.
pub(super) const RESCUE: Rescue = Rescue {
    kept_under: SHEET,
    file_name: "ventrail-sheet.json",
    counted_under: STOPS,
};

/// Where the sheet is kept.
#[derive(Clone, Copy)]
pub(super) struct Keeping {
    /// Whether the browser's store has the sheet.
    pub(super) store: RwSignal<Store>,
    /// The files which are known, the newest last.
    pub(super) files: RwSignal<Vec<Filed>>,
    /// The sheet of another tab.
    pub(super) elsewhere: RwSignal<Option<String>>,
    /// What could not be opened.
    pub(super) rescued: RwSignal<Option<Rescued>>,
    /// The stamp of the text which this tab has last read from the store or written to it.
    stamp: StoredValue<Option<String>>,
    /// The key under which this tab goes on while another one has written the sheet.
    aside: StoredValue<String>,
    /// The text being typed which is still to be written.
    typing: StoredValue<Option<String>>,
}

/// What the store did with the last change.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Store {
    /// Nothing was to be kept yet.
    Untouched,
    /// Kept at a time of day.
    Kept(String),
    /// Kept beside the sheet of another tab, at a time of day, until the person has chosen between the two.
    Aside(String),
    /// Not kept.
    Refused(NotKept),
}

/// A document as it is in a file.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Filed {
    /// Name of the file.
    pub(super) name: String,
    /// What is in it; `None` where an earlier visit to the page saved it.
    pub(super) document: Option<Document>,
}

/// A kept text which was not opened.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Rescued {
    /// The key under which it stays.
    key: String,
    /// The text.
    pub(super) text: String,
    /// Why it was not opened.
    pub(super) why: NotOpened,
}

/// Why a kept text was not opened.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum NotOpened {
    /// The program stopped on it twice.
    Stopped,
    /// It could not be read.
    Unreadable(file::Refusal),
    /// It was set aside at an earlier start.
    Earlier,
    /// Another sheet replaced it, and it is in no file.
    Replaced,
    /// A tab went on with it while another one had written the sheet, and ended before the person chose.
    Aside,
}

impl Keeping {
    /// Takes up what the browser kept: the document, and how things stand with it.
    pub(super) fn start() -> (Self, Document) {
        let aside = format!("{ASIDE}/{}", clock::stamp());
        let keeping = Self {
            store: RwSignal::new(Store::Untouched),
            files: RwSignal::new(Vec::new()),
            elsewhere: RwSignal::new(None),
            rescued: RwSignal::new(earlier(&aside)),
            stamp: StoredValue::new(store::read(STAMP)),
            aside: StoredValue::new(aside),
            typing: StoredValue::new(None),
        };
        let Some(text) = store::read(SHEET) else {
            return (keeping, Document::default());
        };
        if panic::stops(STOPS) >= TOO_MANY_STOPS {
            keeping.set_aside(text, NotOpened::Stopped);
            store::remove(STOPS);
            return (keeping, Document::default());
        }
        match file::read(&text) {
            Ok(document) => {
                keeping.recall_file(&document);
                keeping.store.set(Store::Kept(clock::time_of_day()));
                let document = with_typing(document);
                (keeping, document)
            }
            Err(refusal) => {
                keeping.set_aside(text, NotOpened::Unreadable(refusal));
                (keeping, Document::default())
            }
        }
    }

    /// From now on, says so when another tab changes the sheet.
    pub(super) fn watch_other_tabs(self) {
        store::on_change_elsewhere(SHEET, move |text| {
            if text.is_some() {
                self.elsewhere.try_set(text);
            }
        });
    }

    /// The program runs: it has not stopped on this sheet.
    pub(super) fn runs(self) {
        store::remove(STOPS);
    }

    /// Keeps the document in the browser's store.
    pub(super) fn keep(self, document: &Document) {
        let text = file::write(document);
        let kept = if self.is_other_tab_ahead() {
            self.write_aside(&text)
        } else {
            self.write_sheet(&text)
        };
        self.store.set(kept.unwrap_or_else(Store::Refused));
        self.remember_file(document);
    }

    /// Goes on with this tab's sheet.
    pub(super) fn keep_this(self, document: &Document) {
        let theirs = self.elsewhere.get_untracked();
        if let Some(theirs) = theirs.filter(|theirs| *theirs != file::write(document)) {
            // The other tab may be closed: then nothing else holds its sheet. A full store is said by what follows.
            let _ = store::write(REPLACED, &theirs);
        }
        self.is_up_to_date();
        self.keep(document);
    }

    /// The other tab's sheet, to go on with.
    pub(super) fn take_other(self) -> Option<Result<Document, file::Refusal>> {
        let text = self.elsewhere.get_untracked()?;
        let read = file::read(&text);
        if read.is_ok() {
            self.is_up_to_date();
        }
        Some(read)
    }

    /// The document is now in the file of this name.
    pub(super) fn is_in_file(self, name: String, document: Document) {
        self.files.update(|files| {
            files.push(Filed {
                name,
                document: Some(document.clone()),
            });
            let forgotten = files.len().saturating_sub(FILES_KNOWN);
            files.drain(..forgotten);
        });
        self.remember_file(&document);
    }

    /// The file which holds `document`, or else the newest, with whether it holds it.
    pub(super) fn file_of(self, document: &Document) -> Option<(String, bool)> {
        self.files.with(|files| file_of(files, document))
    }

    /// Whether leaving the page now would lose something, or leave a choice between two tabs' sheets open.
    pub(super) fn would_lose(self, document: &Document) -> bool {
        let is_open = match self.store.try_get_untracked() {
            Some(Store::Refused(_)) => !document.sheet.is_empty(),
            Some(Store::Aside(_)) => true,
            Some(Store::Untouched | Store::Kept(_)) | None => false,
        };
        let is_filed = self
            .files
            .try_with_untracked(|files| matches!(file_of(files, document), Some((_, true))));
        is_open && is_filed != Some(true)
    }

    /// The document is about to be replaced by another one: it is kept where no file has it.
    pub(super) fn is_replaced(self, document: &Document) {
        let is_filed = self
            .files
            .with_untracked(|files| matches!(file_of(files, document), Some((_, true))));
        let is_nothing = document.sheet.is_empty() && document.drafts.is_empty();
        if !is_filed && !is_nothing && !demos::is_demo(document) {
            // Where the store is full, undo is left, and what is not kept is said anyway.
            let _ = store::write(REPLACED, &file::write(document));
        }
    }

    /// The document which was replaced is back.
    pub(super) fn is_back(self) {
        store::remove(REPLACED);
    }

    /// The person is done with what could not be opened.
    pub(super) fn drop_rescued(self) {
        if let Some(rescued) = self.rescued.get_untracked() {
            store::remove(&rescued.key);
        }
        self.rescued
            .set(self.aside.with_value(|aside| earlier(aside)));
    }

    /// Keeps a text which is being typed, a frame later, so that typing never waits for the store.
    pub(super) fn typing(self, place: Place, text: &str) {
        let line = format!("{} {text}", place_name(place));
        let is_waiting = self
            .typing
            .try_update_value(|typing| typing.replace(line).is_some());
        if is_waiting == Some(false) {
            on_next_frame(move || {
                if let Some(Some(line)) = self.typing.try_update_value(Option::take) {
                    // A lost frame of typing is no reason to disturb the person who types.
                    let _ = store::write(TYPING, &line);
                }
            });
        }
    }

    /// Nothing is being typed any more.
    pub(super) fn forget_typing(self) {
        self.typing.set_value(None);
        store::remove(TYPING);
    }

    fn write_sheet(self, text: &str) -> Result<Store, NotKept> {
        store::write(SHEET, text)?;
        let stamp = clock::stamp();
        store::write(STAMP, &stamp)?;
        self.stamp.set_value(Some(stamp));
        // Only now: until the sheet is written, what was put aside is the newest.
        self.aside.with_value(|aside| store::remove(aside));
        panic::offer(SHEET);
        Ok(Store::Kept(clock::time_of_day()))
    }

    fn write_aside(self, text: &str) -> Result<Store, NotKept> {
        self.aside.with_value(|aside| {
            panic::offer(aside);
            store::write(aside, text)
        })?;
        Ok(Store::Aside(clock::time_of_day()))
    }

    /// Whether another tab wrote the sheet since this one did; then its text is held for the person to choose.
    fn is_other_tab_ahead(self) -> bool {
        if self.elsewhere.with_untracked(Option::is_some) {
            return true;
        }
        let is_ahead = store::read(STAMP) != self.stamp.get_value();
        if is_ahead {
            self.elsewhere.set(store::read(SHEET));
        }
        self.elsewhere.with_untracked(Option::is_some)
    }

    /// Goes on from what the store holds now, whoever wrote it.
    fn is_up_to_date(self) {
        self.stamp.set_value(store::read(STAMP));
        self.elsewhere.set(None);
    }

    fn set_aside(self, text: String, why: NotOpened) {
        let free = RESCUED
            .into_iter()
            .find(|key| store::read(key).is_none_or(|kept| kept == text));
        let Some(key) = free else {
            // Everything is taken: the text stays where it is, and counts as another tab's until the person chooses.
            self.elsewhere.set(Some(text));
            return;
        };
        if store::write(key, &text).is_ok() {
            let key = key.to_owned();
            self.rescued.set(Some(Rescued { key, text, why }));
            store::remove(SHEET);
            store::remove(FILED);
        }
    }

    fn remember_file(self, document: &Document) {
        if self.elsewhere.with_untracked(Option::is_some) {
            // The kept name belongs to the kept sheet, and that is another tab's.
            return;
        }
        let known = self.files.with_untracked(|files| file_of(files, document));
        if let Some((name, is_same)) = known {
            let state = if is_same { SAME } else { CHANGED };
            // Lost only with the sheet itself, about which the person hears.
            let _ = store::write(FILED, &format!("{state}{name}"));
        }
    }

    fn recall_file(self, document: &Document) {
        let Some(line) = store::read(FILED) else {
            return;
        };
        let filed = if let Some(name) = line.strip_prefix(SAME) {
            Filed {
                name: name.to_owned(),
                document: Some(document.clone()),
            }
        } else if let Some(name) = line.strip_prefix(CHANGED) {
            Filed {
                name: name.to_owned(),
                document: None,
            }
        } else {
            return;
        };
        self.files.set(vec![filed]);
    }
}

fn file_of(files: &[Filed], document: &Document) -> Option<(String, bool)> {
    let holding = files
        .iter()
        .rfind(|filed| filed.document.as_ref() == Some(document));
    let known = holding.or(files.last())?;
    Some((known.name.clone(), holding.is_some()))
}

/// A text which waits for the person from an earlier start; not what this tab puts aside itself.
fn earlier(own_aside: &str) -> Option<Rescued> {
    let rescued = RESCUED.map(|key| (key.to_owned(), NotOpened::Earlier));
    let aside = store::keys(ASIDE)
        .into_iter()
        .filter(|key| key != own_aside)
        .map(|key| (key, NotOpened::Aside));
    let replaced = [(REPLACED.to_owned(), NotOpened::Replaced)];
    rescued
        .into_iter()
        .chain(aside)
        .chain(replaced)
        .find_map(|(key, why)| {
            Some(Rescued {
                text: store::read(&key)?,
                key,
                why,
            })
        })
}

/// The document with the text which was being typed when the page ended, kept beside its place.
fn with_typing(document: Document) -> Document {
    let Some(line) = store::read(TYPING) else {
        return document;
    };
    let typed = line
        .split_once(' ')
        .and_then(|(place, text)| Some((place_named(place)?, text)));
    match typed {
        Some((place, text)) if !text.trim().is_empty() => {
            document.after(&Edit::Refuse(place, text.to_owned()))
        }
        _ => document,
    }
}

/// A place as a word: `sheet/0/supply_voltage`, `feeder/7/tag`.
fn place_name(place: Place) -> String {
    let field = file::field_name(place.field);
    match place.holder {
        Holder::Sheet => format!("sheet/0/{field}"),
        Holder::Feeder(id) => format!("feeder/{}/{field}", id.0),
        Holder::Source(id) => format!("source/{}/{field}", id.0),
    }
}

fn place_named(name: &str) -> Option<Place> {
    let mut parts = name.split('/');
    let (holder, id, field) = (parts.next()?, parts.next()?, parts.next()?);
    let id = HolderId(id.parse().ok()?);
    let holder = match holder {
        "sheet" => Holder::Sheet,
        "feeder" => Holder::Feeder(id),
        "source" => Holder::Source(id),
        _ => return None,
    };
    Some(Place {
        holder,
        field: field_named(field)?,
    })
}

fn field_named(name: &str) -> Option<Field> {
    use crate::sheet::{Home, fields_of};
    [Home::Sheet, Home::Feeder, Home::Source]
        .into_iter()
        .flat_map(fields_of)
        .find(|field| file::field_name(*field) == name)
}
