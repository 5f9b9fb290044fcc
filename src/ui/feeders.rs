//! The part of the sheet with the feeders: counts, commands, the list, and the form of one feeder.

use super::form;
use super::grid::{self, Cell};
use super::markup::{button, live, tag};
use super::names;
use super::state::Page;
use crate::browser::page as window;
use crate::sheet::{Choice, Document, Edit};
use crate::words::page;
use crate::working::{Field, Holder, HolderId};
use leptos::prelude::*;

/// What can be done with a feeder as a whole.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Command {
    Add,
    Duplicate,
    Delete,
    MoveUp,
    MoveDown,
    Form,
}

/// Commands which need a feeder, in the order of their buttons.
const ON_A_FEEDER: [Command; 5] = [
    Command::Form,
    Command::Duplicate,
    Command::MoveUp,
    Command::MoveDown,
    Command::Delete,
];

impl Command {
    const fn label(self) -> &'static str {
        match self {
            Command::Add => page::add_feeder(),
            Command::Duplicate => page::duplicate_feeder(),
            Command::Delete => page::delete_feeder(),
            Command::MoveUp => page::move_up(),
            Command::MoveDown => page::move_down(),
            Command::Form => page::feeder_form_open(),
        }
    }

    const fn id(self) -> &'static str {
        match self {
            Command::Add => "add-feeder",
            Command::Duplicate => "duplicate-feeder",
            Command::Delete => "delete-feeder",
            Command::MoveUp => "move-feeder-up",
            Command::MoveDown => "move-feeder-down",
            Command::Form => "open-feeder",
        }
    }
}

/// The feeders with everything around them.
pub(super) fn feeders(page: Page) -> AnyView {
    let counts = move || page.with(counts);
    let has_feeders = Memo::new(move |_| page.with(|document| !document.sheet.feeders.is_empty()));
    let row = move || page.cursor.get().map(|cell| cell.row);
    let command_button = move |command: Command| {
        button(move || press(page, command))
            .id(command.id())
            .text(command.label())
    };
    let chosen = tag("SPAN")
        .class("chosen")
        .set("role", "group")
        .set("aria-label", page::feeder_commands())
        .hidden(move || row().is_none())
        .with(tag("B").live_text(move || {
            row().map_or_else(String::new, |id| {
                page.with(|document| names::holder(document, Holder::Feeder(id)))
            })
        }))
        .children(ON_A_FEEDER.map(|command| command_button(command).done()));
    let list = live(move || {
        if has_feeders.get() {
            grid::grid(page)
        } else {
            tag("P").class("empty").text(page::no_feeders()).done()
        }
    });
    tag("SECTION")
        .id("feeders")
        .set("aria-labelledby", "feeders-head")
        .with(
            tag("H2")
                .id("feeders-head")
                .set("tabindex", "-1")
                .say(format!("{} ", page::heading_feeders()))
                .with(tag("SMALL").live_text(counts)),
        )
        .with(
            tag("DIV")
                .class("tools")
                .with(command_button(Command::Add).class("main"))
                .with(chosen),
        )
        .child(list)
        .child(form::form(page))
        .done()
}

/// How many feeders there are, and which of them stand by.
pub(super) fn counts(document: &Document) -> String {
    let feeders = &document.sheet.feeders;
    let standing_by: Vec<String> = feeders
        .iter()
        .filter(|item| item.record.choice(Field::Running) == Some(Choice::Standby))
        .map(|item| names::holder(document, Holder::Feeder(item.id)))
        .collect();
    page::feeder_counts(feeders.len(), &standing_by)
}

/// A button was pressed: it is about the row with the cursor.
fn press(page: Page, command: Command) {
    let cell = page.cursor.get_untracked();
    match (command, cell) {
        (_, Some(cell)) => run(page, command, cell),
        (Command::Add, None) => add(page, None),
        _ => {}
    }
}

/// Does a command on the feeder of a cell, and leaves the focus at what came of it.
pub(super) fn run(page: Page, command: Command, cell: Cell) {
    let id = cell.row;
    match command {
        Command::Add => add(page, Some(id)),
        Command::Duplicate => {
            let copy = next_id(page);
            if page.edit(Edit::DuplicateFeeder(id)) {
                page.say(page::feeder_duplicated(&name(page, id)));
                begin_row(page, copy);
            }
        }
        Command::Delete => delete(page, cell),
        Command::MoveUp | Command::MoveDown => {
            let up = command == Command::MoveUp;
            if page.edit(Edit::MoveFeeder { id, up }) {
                let row = row_of(page, id).unwrap_or(0) + 1;
                page.say(page::feeder_moved(&name(page, id), row));
            }
            // The row is moved about in the page, and a moved element loses the focus.
            grid::go_to_soon(page, cell);
        }
        Command::Form => form::open(page, id),
    }
}

/// Adds the first feeder of a sheet, or another one at its end.
fn add(page: Page, after: Option<HolderId>) {
    let id = next_id(page);
    if page.edit(Edit::AddFeeder { after }) {
        let row = row_of(page, id).unwrap_or(0) + 1;
        page.say(page::feeder_added(row));
        begin_row(page, id);
    }
}

fn delete(page: Page, cell: Cell) {
    let row = row_of(page, cell.row).unwrap_or(0);
    let named = name(page, cell.row);
    if !page.edit(Edit::DeleteFeeder(cell.row)) {
        return;
    }
    if page.form.get_untracked() == Some(cell.row) {
        page.form.set(None);
    }
    page.say(page::feeder_deleted(&named));
    let rows = page.peek(grid::rows);
    match rows.get(row).or(rows.last()) {
        Some(next) => grid::go_to_soon(page, Cell { row: *next, ..cell }),
        None => {
            window::focus(Command::Add.id());
        }
    }
}

/// Puts the cursor on the first cell of a new row.
fn begin_row(page: Page, row: HolderId) {
    grid::go_to_soon(page, Cell { row, column: 0 });
}

fn row_of(page: Page, id: HolderId) -> Option<usize> {
    page.peek(grid::rows).iter().position(|row| *row == id)
}

fn name(page: Page, id: HolderId) -> String {
    page.peek(|document| names::holder(document, Holder::Feeder(id)))
}

fn next_id(page: Page) -> HolderId {
    HolderId(page.peek(|document| document.sheet.next_id))
}
