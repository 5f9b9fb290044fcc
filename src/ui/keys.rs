//! What keys, clicks and focus mean in the feeder list.
//!
//! A cell is either walked over or edited. Walking, the focus is on the cell; editing, it is on the control in it.

use super::columns::{COLUMNS, Content};
use super::feeders::{self, Command};
use super::field::{choose, is_taken, text_to_edit};
use super::grid::{Cell, EDITOR, Editing, How, go_to, mark, rows};
use super::spot;
use super::state::Page;
use crate::browser::page::{self as window, Event, EventTarget, Key};
use crate::sheet::{Edit, Shape, spec};
use crate::words::page;
use leptos::prelude::*;

/// Rows which Page Up and Page Down go.
const PAGE: usize = 10;

/// Where to go from a cell.
#[derive(Clone, Copy)]
enum Step {
    Up(usize),
    Down(usize),
    Left,
    Right,
    RowStart,
    RowEnd,
    GridStart,
    GridEnd,
}

/// A key was pressed somewhere in the grid.
pub(super) fn on_key(page: Page, event: &Event) {
    let Some(key) = window::key(event) else {
        return;
    };
    let is_handled = if page.editing.with_untracked(Option::is_some) {
        while_editing(page, &key)
    } else if let Some(cell) = page.cursor.get_untracked() {
        while_walking(page, cell, &key)
    } else {
        false
    };
    if is_handled {
        window::take(event);
    }
}

/// The focus came to something in the grid.
pub(super) fn on_focus(page: Page, target: Option<EventTarget>) {
    let Some(cell) = cell_of(target) else {
        return;
    };
    mark(page, cell);
    page.spot
        .set(cell.column().and_then(|column| match cell.place() {
            Some(place) => Some(super::field::spot_of(page, place)),
            None => page.worked.with_untracked(|worked| {
                column.spot(cell.row, spot::feeder(worked, cell.row).map(AsRef::as_ref))
            }),
        }));
}

/// The focus leaves something in the grid: what was being edited is taken.
pub(super) fn on_leave(page: Page, target: Option<EventTarget>) {
    let is_editor = window::nearest(target, "#cell-editor").is_some();
    // Going to another window and back is no reason to take a half-typed text.
    if is_editor && window::has_focus() {
        take(page);
    }
}

/// The mouse goes down somewhere in the grid.
pub(super) fn on_press(page: Page, target: Option<EventTarget>) {
    let cell = cell_of(target);
    let is_there = cell.is_some_and(|cell| window::focused_within("td, th") == Some(cell.id()));
    page.pressed.set_value(cell.filter(|_| is_there));
}

/// A click on the cell which had the focus already edits it.
pub(super) fn on_click(page: Page, target: Option<EventTarget>) {
    let pressed = page.pressed.get_value();
    if page.editing.with_untracked(Option::is_none)
        && let Some(cell) = cell_of(target).filter(|cell| Some(*cell) == pressed)
    {
        begin(page, cell, None);
    }
}

/// Takes what is being edited, as if the cell were left.
pub(super) fn finish(page: Page) {
    if let Some(editing) = page.editing.get_untracked() {
        take(page);
        go_to(page, editing.cell);
    }
}

/// A text is being typed.
pub(super) fn on_typing(page: Page, target: Option<EventTarget>) {
    if let (Some(editing), Some(text)) = (page.editing.get_untracked(), window::typed(target))
        && editing.how != How::List
    {
        page.keeping.typing(editing.place, &text);
    }
}

fn cell_of(target: Option<EventTarget>) -> Option<Cell> {
    let element = window::nearest(target, "[role=gridcell], [role=rowheader]")?;
    Cell::of_id(&element.id())
}

fn while_walking(page: Page, cell: Cell, key: &Key) -> bool {
    if let Some(command) = command(key) {
        feeders::run(page, command, cell);
        return true;
    }
    let step = match (key.name.as_str(), key.control, key.alt) {
        ("ArrowUp", false, false) => Step::Up(1),
        ("ArrowDown", false, false) => Step::Down(1),
        ("PageUp", false, false) => Step::Up(PAGE),
        ("PageDown", false, false) => Step::Down(PAGE),
        ("ArrowLeft", false, false) => Step::Left,
        ("ArrowRight", false, false) => Step::Right,
        ("Home", false, false) => Step::RowStart,
        ("End", false, false) => Step::RowEnd,
        ("Home", true, false) => Step::GridStart,
        ("End", true, false) => Step::GridEnd,
        ("Enter" | "F2", false, false) => {
            enter(page, cell);
            return true;
        }
        (" ", false, false) => {
            page.is_chain_open.update(|is_open| *is_open = !*is_open);
            return true;
        }
        ("Delete" | "Backspace", false, false) => return clear(page, cell),
        // An accent comes with the letter after it: the control has to be there to receive both.
        ("Dead" | "Process", false, _) => {
            begin(page, cell, Some(""));
            return false;
        }
        (name, false, false) if name.chars().count() == 1 => {
            let is_pin = name.eq_ignore_ascii_case("p") && cell.place().is_none();
            return !is_pin && begin(page, cell, Some(name));
        }
        _ => return false,
    };
    walk(page, cell, step);
    true
}

fn command(key: &Key) -> Option<Command> {
    match (key.name.as_str(), key.control, key.alt, key.shift) {
        ("ArrowUp", false, true, false) => Some(Command::MoveUp),
        ("ArrowDown", false, true, false) => Some(Command::MoveDown),
        ("Enter", true, false, false) => Some(Command::Add),
        ("Enter", true, false, true) => Some(Command::Duplicate),
        ("Delete" | "Backspace", true, false, false) => Some(Command::Delete),
        ("Enter", false, true, false) => Some(Command::Form),
        _ => None,
    }
}

/// Enter edits a field, and goes from a mark to its note.
fn enter(page: Page, cell: Cell) {
    let is_marks = cell
        .column()
        .is_some_and(|column| column.content == Content::Marks);
    if is_marks {
        super::margin::go_to_note_of(page, cell.row);
    } else if !begin(page, cell, None) {
        page.is_chain_open.set(true);
    }
}

/// Begins to edit a cell, with the key that was typed, or with its old text; gives whether it can be edited.
fn begin(page: Page, cell: Cell, typed: Option<&str>) -> bool {
    let Some(place) = cell.place() else {
        return false;
    };
    let is_choice = matches!(spec(place.field).shape, Shape::Choice(_));
    let (how, text) = match typed {
        Some(typed) => (How::Onward, typed.to_owned()),
        None if is_choice => (How::List, String::new()),
        None => (How::Whole, text_to_edit(page, place)),
    };
    page.editing.set(Some(Editing {
        cell,
        place,
        text,
        how,
    }));
    match how {
        How::Whole => window::focus_and_select_soon(EDITOR),
        How::Onward | How::List => window::focus_soon(EDITOR.to_owned()),
    }
    true
}

fn clear(page: Page, cell: Cell) -> bool {
    let Some(place) = cell.place() else {
        return false;
    };
    if page.edit(Edit::Clear(place)) {
        page.say(page::emptied(crate::words::label(place.field)));
    }
    true
}

fn while_editing(page: Page, key: &Key) -> bool {
    let Some(editing) = page.editing.get_untracked() else {
        return false;
    };
    // Keys which end the composing of a letter belong to the composing.
    if key.is_composing {
        return false;
    }
    let cell = editing.cell;
    let is_list = editing.how == How::List;
    let step = match (key.name.as_str(), key.shift) {
        ("Escape", _) => {
            page.editing.set(None);
            page.keeping.forget_typing();
            go_to(page, cell);
            return true;
        }
        ("Enter", false) => Step::Down(1),
        ("Enter", true) => Step::Up(1),
        ("ArrowDown", _) if !is_list => Step::Down(1),
        ("ArrowUp", _) if !is_list => Step::Up(1),
        ("Tab", is_back) => return leave_by_tab(page, cell, is_back),
        _ => return false,
    };
    if take(page) {
        walk(page, cell, step);
    } else {
        go_to(page, cell);
    }
    true
}

/// Takes what was typed and goes to the next field of the row; behind the last one, Tab leaves the grid.
fn leave_by_tab(page: Page, cell: Cell, is_back: bool) -> bool {
    let is_taken = take(page);
    let is_field = |column: &usize| {
        COLUMNS
            .get(*column)
            .is_some_and(|column| column.field().is_some())
    };
    let next = if is_back {
        (0..cell.column).rev().find(is_field)
    } else {
        (cell.column + 1..COLUMNS.len()).find(is_field)
    };
    match next {
        _ if !is_taken => go_to(page, cell),
        Some(column) => go_to(page, Cell { column, ..cell }),
        None => {
            // The cell has the focus while the browser looks for what comes after it.
            go_to(page, cell);
            return false;
        }
    }
    true
}

/// Ends the edit and takes what was typed or picked; gives whether it was taken.
fn take(page: Page) -> bool {
    let Some(editing) = page.editing.get_untracked() else {
        return true;
    };
    let typed = window::typed_in(EDITOR).unwrap_or_default();
    page.editing.set(None);
    match (editing.how, spec(editing.place.field).shape) {
        (How::List, Shape::Choice(offered)) => {
            page.edit(choose(editing.place, offered, &typed));
            true
        }
        // A text which was looked at and left as it was is no edit.
        (How::Whole, _) if typed == editing.text => {
            page.keeping.forget_typing();
            true
        }
        _ => is_taken(&page.enter(editing.place, &typed)),
    }
}

fn walk(page: Page, from: Cell, step: Step) {
    let rows = page.peek(rows);
    let last_column = COLUMNS.len().saturating_sub(1);
    let last_row = rows.len().saturating_sub(1);
    let row = rows.iter().position(|row| *row == from.row).unwrap_or(0);
    let column = from.column;
    let (row, column) = match step {
        Step::Up(by) => (row.saturating_sub(by), column),
        Step::Down(by) => ((row + by).min(last_row), column),
        Step::Left => (row, column.saturating_sub(1)),
        Step::Right => (row, (column + 1).min(last_column)),
        Step::RowStart => (row, 0),
        Step::RowEnd => (row, last_column),
        Step::GridStart => (0, 0),
        Step::GridEnd => (last_row, last_column),
    };
    if let Some(row) = rows.get(row) {
        go_to(page, Cell { row: *row, column });
    }
}
