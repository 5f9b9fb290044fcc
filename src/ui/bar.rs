//! The bar at the head of the window: where the sheet is kept, undo, files, print; and the messages under it.

use super::demos;
use super::keep::{NotOpened, Store};
use super::keys;
use super::margin::MARGIN;
use super::markup::{self, Markup, button, live, several, tag};
use super::names;
use super::state::Page;
use super::summary;
use crate::browser::files::{self, Content, Picked, Saved};
use crate::browser::page as window;
use crate::browser::store::NotKept;
use crate::file;
use crate::sheet::Document;
use crate::words::{self, page};
use leptos::prelude::*;

/// Bytes which a file may have.
pub(super) const LARGEST_FILE: usize = file::LARGEST_FILE;
/// The id of the hidden file input.
const FILE_INPUT: &str = "file-input";

/// A message under the bar which stays until it is dismissed.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Message {
    /// A file was not opened.
    FileRefused {
        /// Its name.
        name: String,
        /// Why.
        why: String,
    },
    /// A sheet could not be saved as a file.
    NotSaved,
}

/// The bar, and the messages under it.
pub(super) fn bar(page: Page) -> AnyView {
    let files = tag("NAV")
        .class("files")
        .set("aria-label", page::files_label())
        .with(named("new-sheet", page::new_sheet(), move || {
            start_anew(page)
        }))
        .with(named("demo-sheet", page::demo_sheet(), move || {
            if let Some(demo) = demos::DEMOS.first() {
                open_demo(page, demo);
            }
        }))
        .with(named("open-file", page::open_file(), choose_file))
        .with(named("save-file", page::save_file(), move || save(page)))
        .with(named("print", page::print(), window::print))
        .with(named("keys", page::keys_button(), summary::show_keys));
    let margin = button(move || page.is_margin_open.update(|is_open| *is_open = !*is_open))
        .class("margin-toggle")
        .id("toggle-margin")
        .set("aria-controls", MARGIN)
        .claim("aria-expanded", move || page.is_margin_open.get())
        .live_text(move || {
            let counts = page.notes.with(|notes| notes.counts());
            format!("{}: {counts}", page::heading_margin())
        });
    let input = tag("INPUT")
        .set("type", "file")
        .id(FILE_INPUT)
        .set("accept", ".json,application/json")
        .set("hidden", "")
        .set("aria-label", page::open_file())
        .on("change", move |_| {
            files::read_chosen(FILE_INPUT, LARGEST_FILE, move |picked| open(page, picked));
        });
    let undo = step_button(
        "undo",
        "Ctrl Z",
        move || named_undo(page),
        move || page.undo(),
    );
    let redo = step_button(
        "redo",
        "Ctrl Y",
        move || named_redo(page),
        move || page.redo(),
    );
    let bar = tag("HEADER")
        .class("bar")
        .set("aria-label", page::bar_label())
        .with(
            tag("A")
                .class("skip")
                .set("href", "#title-head")
                .text(page::skip_to_sheet()),
        )
        .with(tag("B").class("program").text(page::program()))
        .with(tag("P").class("kept").live_text(move || kept(page)))
        .with(tag("SPAN").class("steps-back").with(undo).with(redo))
        .with(files)
        .with(margin)
        .with(input)
        .done();
    several(vec![bar, live(move || messages(page))])
}

fn named(id: &'static str, text: &'static str, act: impl FnMut() + Send + 'static) -> Markup {
    button(act).id(id).text(text)
}

/// A button which goes one step through the history, named by that step.
fn step_button(
    id: &'static str,
    key: &'static str,
    step: impl Fn() -> Option<String> + Copy + Send + 'static,
    act: impl FnMut() + Send + 'static,
) -> Markup {
    button(act)
        .id(id)
        .live("title", step)
        .claim("aria-disabled", move || step().is_none())
        .with(tag("KBD").text(key))
        .with(tag("SPAN").live_text(move || {
            step().unwrap_or_else(|| {
                if id == "undo" {
                    page::undo()
                } else {
                    page::redo()
                }
                .to_owned()
            })
        }))
}

fn named_undo(page: Page) -> Option<String> {
    page.history.with(|history| {
        let edit = history.undoable()?;
        Some(page::undo_named(&names::edit(edit, history.now())))
    })
}

fn named_redo(page: Page) -> Option<String> {
    page.history.with(|history| {
        let edit = history.redoable()?;
        Some(page::redo_named(&names::edit(edit, history.now())))
    })
}

/// Where the sheet is kept, in the browser and in a file.
fn kept(page: Page) -> String {
    let here = match page.keeping.store.get() {
        Store::Untouched => None,
        Store::Kept(time) => Some(page::saved_here_at(&time)),
        Store::Aside(_) => Some(page::kept_aside().to_owned()),
        Store::Refused(_) => Some(page::not_kept_here().to_owned()),
    };
    let in_file = page.with(|document| match page.keeping.file_of(document) {
        Some((name, true)) => page::in_file(&name),
        Some((name, false)) => page::changed_since(&name),
        None if document.sheet.is_empty() => String::new(),
        None => page::not_in_file().to_owned(),
    });
    match here {
        Some(here) if in_file.is_empty() => here,
        Some(here) => format!("{here}. {in_file}."),
        None => in_file,
    }
}

/// Saves the sheet as a file. Called while a click or a key is handled, since browsers ask for that.
pub(super) fn save(page: Page) {
    // What is still being typed belongs into the file.
    keys::finish(page);
    window::finish_typing();
    let document = page.peek(Document::clone);
    let text = file::write(&document);
    files::save(&names::file(&document), text, move |saved| match saved {
        Saved::InFile(name) | Saved::HandedOver(name) => {
            page.say(page::file_saved_as(&name));
            page.keeping.is_in_file(name, document);
        }
        Saved::GivenUp => {}
        Saved::Failed => page.message.set(Some(Message::NotSaved)),
    });
}

/// Opens the file window.
pub(super) fn choose_file() {
    files::choose(FILE_INPUT);
}

/// Opens a picked file, or says why not; the sheet in hand stays then.
pub(super) fn open(page: Page, picked: Picked) {
    let read = match picked.content {
        Content::Text(text) => file::read(&text).map_err(|refusal| words::file_refusal(&refusal)),
        Content::TooLarge => Err(page::file_too_large().to_owned()),
        Content::Unreadable => Err(page::file_unreadable().to_owned()),
    };
    match read {
        Ok(document) => {
            page.message.set(None);
            page.replace(document.clone());
            page.keeping.is_in_file(picked.name.clone(), document);
            page.say(page::file_opened_as(&picked.name));
        }
        Err(why) => page.message.set(Some(Message::FileRefused {
            name: picked.name,
            why,
        })),
    }
}

/// Puts an empty sheet in place of this one.
fn start_anew(page: Page) {
    page.replace(Document::default());
    page.say(page::sheet_replaced().to_owned());
    window::focus("new-sheet");
}

/// Puts a demo sheet in place of this one.
pub(super) fn open_demo(page: Page, demo: &'static demos::Demo) {
    match file::read(demo.text) {
        Ok(document) => {
            page.replace(document);
            page.say(page::file_opened_as(demo.name));
            window::focus_soon("title-head".to_owned());
        }
        Err(refusal) => page.message.set(Some(Message::FileRefused {
            name: demo.name.to_owned(),
            why: words::file_refusal(&refusal),
        })),
    }
}

fn messages(page: Page) -> AnyView {
    let messages = [
        page.message
            .get()
            .map(|message| message_view(page, &message)),
        store_message(page),
        page.keeping
            .elsewhere
            .with(Option::is_some)
            .then(|| other_tab(page)),
        rescued(page),
    ];
    several(messages.into_iter().flatten().collect())
}

fn message(id: &'static str, text: Vec<AnyView>) -> Markup {
    tag("DIV")
        .class("message")
        .id(id)
        .set("role", "alert")
        .with(tag("P").children(text))
}

fn message_view(page: Page, shown: &Message) -> AnyView {
    let (head, text) = match shown {
        Message::FileRefused { name, why } => (
            format!("{}: {name}", page::file_refused_title()),
            format!(" {why} {}", page::file_refused_kept()),
        ),
        Message::NotSaved => (
            page::save_failed_title().to_owned(),
            format!(" {}", page::save_failed()),
        ),
    };
    let close = move || {
        page.message.set(None);
        window::focus("open-file");
    };
    message(
        "message",
        vec![tag("B").say(head).done(), markup::words(text)],
    )
    .with(button(close).text(page::close()))
    .done()
}

fn store_message(page: Page) -> Option<AnyView> {
    let Store::Refused(why) = page.keeping.store.get() else {
        return None;
    };
    let text = match why {
        NotKept::Missing => page::store_missing(),
        NotKept::Full => page::store_full(),
    };
    let save = button(move || save(page)).text(page::save_file());
    Some(
        message("store-message", vec![markup::words(text.to_owned())])
            .with(save)
            .done(),
    )
}

fn other_tab(page: Page) -> AnyView {
    let take = move || match page.keeping.take_other() {
        Some(Ok(document)) => {
            page.replace(document);
            page.say(page::other_tab_taken().to_owned());
        }
        Some(Err(refusal)) => page.message.set(Some(Message::FileRefused {
            name: page::other_tab_name().to_owned(),
            why: words::file_refusal(&refusal),
        })),
        None => {}
    };
    let keep = move || page.peek(|document| page.keeping.keep_this(document));
    message(
        "other-tab",
        vec![markup::words(page::other_tab().to_owned())],
    )
    .with(named("take-other", page::other_tab_take(), take))
    .with(named("keep-this", page::other_tab_keep(), keep))
    .done()
}

fn rescued(page: Page) -> Option<AnyView> {
    let rescued = page.keeping.rescued.get()?;
    let why = match &rescued.why {
        NotOpened::Stopped => page::stopped_twice().to_owned(),
        NotOpened::Earlier => page::rescued_earlier().to_owned(),
        NotOpened::Replaced => page::rescued_replaced().to_owned(),
        NotOpened::Aside => page::rescued_aside().to_owned(),
        NotOpened::Unreadable(refusal) => format!(
            "{} {}",
            page::store_unreadable(),
            words::file_refusal(refusal)
        ),
    };
    let text = rescued.text;
    let save = move || {
        files::save(page::rescued_file_name(), text.clone(), move |saved| {
            if saved == Saved::Failed {
                page.message.set(Some(Message::NotSaved));
            }
        });
    };
    let done = move || page.keeping.drop_rescued();
    Some(
        message("rescued", vec![markup::words(why)])
            .with(named("save-rescued", page::save_kept_text(), save))
            .with(named("drop-rescued", page::rescued_drop(), done))
            .done(),
    )
}
