//! The feeder list: a grid with one row for each feeder.
//!
//! All events are heard at the table and find their cell by its id, so that a cell is plain markup and a row costs one
//! memo. Not here: what stands in a cell ([`super::columns`]), what the keys mean ([`super::keys`]).

use super::columns::{COLUMNS, Column, Content, Group};
use super::field::{keypad, options, shown, unchosen, why_refused};
use super::keys;
use super::markup::{Markup, each, live, nothing, several, tag, unseen};
use super::shared::Shared;
use super::shown::{Holding, Shown, Writing, grade_mark};
use super::spot;
use super::state::Page;
use crate::browser::page as window;
use crate::sheet::{Document, Drafts, Item, Shape, UnitSystem, spec};
use crate::words::page;
use crate::work::WorkedFeeder;
use crate::working::{Grade, Holder, HolderId, Place};
use leptos::prelude::*;
use std::collections::BTreeMap;

/// The id of the control in which a cell is edited.
pub(super) const EDITOR: &str = "cell-editor";

/// The id of the text which says why what is edited was refused before. It stands beside the grid: a cell being edited
/// holds its control alone.
const EDITOR_WHY: &str = "cell-editor-why";

/// A cell of the grid.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Cell {
    /// The feeder in whose row it is.
    pub(super) row: HolderId,
    /// Its column, counted from nought.
    pub(super) column: usize,
}

/// A cell being edited.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Editing {
    /// The cell.
    pub(super) cell: Cell,
    /// Its place on the sheet.
    pub(super) place: Place,
    /// The text with which the edit began.
    pub(super) text: String,
    /// How the cell is edited.
    pub(super) how: How,
}

/// How a cell is edited.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum How {
    /// Typing, with the old text selected.
    Whole,
    /// Typing, behind what was typed already.
    Onward,
    /// Choosing from a list.
    List,
}

impl Cell {
    /// The id of the cell's element.
    pub(super) fn id(self) -> String {
        format!("cell-{}-{}", self.row.0, self.column)
    }

    /// The cell whose element has this id.
    pub(super) fn of_id(id: &str) -> Option<Self> {
        let (row, column) = id.strip_prefix("cell-")?.split_once('-')?;
        Some(Self {
            row: HolderId(row.parse().ok()?),
            column: column.parse().ok()?,
        })
    }

    /// The column.
    pub(super) fn column(self) -> Option<Column> {
        COLUMNS.get(self.column).copied()
    }

    /// The place which is entered in this cell.
    pub(super) fn place(self) -> Option<Place> {
        Some(Place {
            holder: Holder::Feeder(self.row),
            field: self.column()?.field()?,
        })
    }
}

/// Moves the cursor to a cell, and the focus with it.
pub(super) fn go_to(page: Page, cell: Cell) {
    mark(page, cell);
    window::focus(&cell.id());
}

/// As [`go_to`], once the page has been brought up to date.
pub(super) fn go_to_soon(page: Page, cell: Cell) {
    crate::browser::soon(move || go_to(page, cell));
}

/// Makes a cell the one which Tab reaches.
pub(super) fn mark(page: Page, cell: Cell) {
    let before = page.cursor.get_untracked();
    if let Some(before) = before.filter(|before| *before != cell) {
        window::set_attribute(&before.id(), "tabindex", "-1");
    }
    window::set_attribute(&cell.id(), "tabindex", "0");
    if before != Some(cell) {
        page.cursor.set(Some(cell));
    }
}

/// The feeders in their order.
pub(super) fn rows(document: &Document) -> Vec<HolderId> {
    document.sheet.feeders.iter().map(|item| item.id).collect()
}

/// Keeps one cell within reach of Tab, whatever came of the rows.
fn keep_reachable(page: Page, rows: &[HolderId]) {
    let cursor = page.cursor.get_untracked();
    let there = cursor.filter(|cell| rows.contains(&cell.row));
    let first = rows.first().map(|row| Cell {
        row: *row,
        column: 0,
    });
    match there.or(first) {
        Some(cell) => mark(page, cell),
        None => page.cursor.set(None),
    }
}

/// The grid with its heads.
pub(super) fn grid(page: Page) -> AnyView {
    Effect::new(move || {
        let rows = page.with(rows);
        // After the rows are drawn.
        crate::browser::soon(move || keep_reachable(page, &rows));
    });
    let heads = live(move || several(column_heads(page)));
    let body = each(move || page.with(rows), |id| id.0.to_string(), row, page);
    let table = tag("TABLE")
        .id("feeder-grid")
        .class("grid")
        .set("role", "grid")
        .set("aria-label", page::grid_label())
        .set("aria-describedby", "grid-help")
        .put("aria-colcount", COLUMNS.len().to_string())
        .live("aria-rowcount", move || {
            Some((page.with(|document| document.sheet.feeders.len()) + 2).to_string())
        })
        .on("keydown", move |event| keys::on_key(page, &event))
        .on("focusin", move |event| keys::on_focus(page, event.target()))
        .on("focusout", move |event| {
            keys::on_leave(page, event.target())
        })
        .on("mousedown", move |event| {
            keys::on_press(page, event.target());
        })
        .on("click", move |event| {
            keys::on_click(page, event.target());
        })
        .on("input", move |event| keys::on_typing(page, event.target()))
        .with(tag("COLGROUP").children(COLUMNS.iter().map(|_| tag("COL").done())))
        .with(
            tag("THEAD")
                .with(tag("TR").children(group_heads()))
                .with(tag("TR").child(heads)),
        )
        .with(tag("TBODY").child(body));
    several(vec![
        tag("DIV").class("scroll").with(table).done(),
        tag("P")
            .id("grid-help")
            .class("help")
            .text(page::grid_help())
            .done(),
        tag("P")
            .id(EDITOR_WHY)
            .class("unseen")
            .live_text(move || {
                page.editing.with(|editing| {
                    let refused = editing.as_ref().and_then(|editing| why(page, editing));
                    refused.unwrap_or_default()
                })
            })
            .done(),
    ])
}

fn group_heads() -> Vec<AnyView> {
    Group::spans()
        .into_iter()
        .enumerate()
        .map(|(position, (group, columns))| {
            tag("TH")
                .class(if position == 0 {
                    "group"
                } else {
                    "group begins"
                })
                .set("scope", "colgroup")
                .put("colspan", columns.to_string())
                .text(group.head())
                .done()
        })
        .collect()
}

fn column_heads(page: Page) -> Vec<AnyView> {
    let system = page.system();
    let mut before = None;
    COLUMNS
        .iter()
        .map(|column| {
            tag("TH")
                .class(cell_class(*column, before.replace(*column)))
                .set("scope", "col")
                .say(format!("{} ", column.head()))
                .with(tag("SMALL").text(column.unit(system)))
                .done()
        })
        .collect()
}

fn cell_class(column: Column, before: Option<Column>) -> &'static str {
    match (column.is_number, column.begins_group(before)) {
        (true, true) => "number begins",
        (true, false) => "number",
        (false, true) => "begins",
        (false, false) => "",
    }
}

/// Of what a row is drawn. What was neither entered nor worked again is the very same, so an edit draws only the rows it
/// has to do with.
#[derive(Clone, PartialEq)]
struct Drawn {
    item: Shared<Item>,
    feeder: Shared<WorkedFeeder>,
    drafts: Drafts,
    grades: Vec<Grade>,
    system: UnitSystem,
    /// The cell being edited, where it is in this row.
    editing: Option<Editing>,
}

/// What a row shows.
struct Row {
    cells: Vec<Shown>,
    grades: Vec<Grade>,
    /// Why texts were refused, by column.
    refusals: BTreeMap<usize, String>,
    editing: Option<Editing>,
}

impl Drawn {
    /// What there is to draw of a feeder; `row` is where it was found last, and is found again.
    fn of(page: Page, id: HolderId, row: &mut usize) -> Option<Self> {
        let holder = Holder::Feeder(id);
        let (item, drafts) = page.with(|document| {
            let items = &document.sheet.feeders;
            if items.get(*row).is_none_or(|item| item.id != id) {
                *row = items.iter().position(|item| item.id == id)?;
            }
            let drafts = document.drafts.iter();
            let drafts: Drafts = drafts
                .filter(|(place, _)| place.holder == holder)
                .map(|(place, text)| (*place, text.clone()))
                .collect();
            Some((items.get(*row).map(Shared::from)?, drafts))
        })?;
        let feeder = page.worked.with(|worked| {
            let there = worked.feeders.get(*row).filter(|feeder| feeder.id == id);
            there.or(spot::feeder(worked, id)).map(Shared::from)
        })?;
        Some(Self {
            item,
            feeder,
            drafts,
            grades: page.notes.with(|notes| notes.grades_at(holder)),
            system: page.system(),
            editing: page
                .editing
                .with(|editing| editing.clone().filter(|editing| editing.cell.row == id)),
        })
    }

    fn row(&self) -> Row {
        let holding = Holding {
            record: Some(&self.item.record),
            drafts: &self.drafts,
            assumptions: &self.feeder.assumptions,
            system: self.system,
        };
        let cells: Vec<Shown> = COLUMNS
            .iter()
            .map(|column| column.shown(holding, &self.feeder))
            .collect();
        let refusals: BTreeMap<usize, String> = cells
            .iter()
            .enumerate()
            .filter_map(|(position, shown)| match shown {
                Shown::Refused(text) => {
                    let field = COLUMNS.get(position)?.field()?;
                    Some((position, why_refused(field, text, self.system)))
                }
                _ => None,
            })
            .collect();
        Row {
            cells,
            grades: self.grades.clone(),
            refusals,
            editing: self.editing.clone(),
        }
    }
}

fn row(page: Page, id: HolderId) -> AnyView {
    let place = StoredValue::new(0);
    let drawn = Memo::new(move |_| {
        let mut row = place.get_value();
        let drawn = Drawn::of(page, id, &mut row);
        place.set_value(row);
        drawn
    });
    tag("TR")
        .live("class", move || {
            drawn.with(|drawn| {
                let drawn = drawn.as_ref()?;
                (!drawn.feeder.is_running).then(|| "standby".to_owned())
            })
        })
        .child(live(move || {
            drawn.with(|drawn| match drawn {
                Some(drawn) => several(cells(page, id, &drawn.row())),
                None => nothing(),
            })
        }))
        .done()
}

fn cells(page: Page, id: HolderId, row: &Row) -> Vec<AnyView> {
    let mut before = None;
    COLUMNS
        .iter()
        .zip(&row.cells)
        .enumerate()
        .map(|(position, (column, shown))| {
            let cell = Cell {
                row: id,
                column: position,
            };
            let class = cell_class(*column, before.replace(*column));
            cell_view(page, cell, shown, row, class)
        })
        .collect()
}

/// A cell. Its element stays the same whether it is edited or not, so that the focus can rest on it.
fn cell_view(page: Page, cell: Cell, shown: &Shown, row: &Row, class: &str) -> AnyView {
    let id = cell.id();
    let editing = row.editing.as_ref().filter(|editing| editing.cell == cell);
    let why = row.refusals.get(&cell.column);
    let why_id = format!("{id}-why");
    let ink = match editing {
        Some(_) => "editing",
        None => shown.class(),
    };
    let of_why = |value: &str| why.is_some().then(|| value.to_owned());
    let element = if cell.column == 0 {
        tag("TH").set("scope", "row").set("role", "rowheader")
    } else {
        let is_fixed = cell.place().is_none();
        tag("TD")
            .set("role", "gridcell")
            .maybe("aria-readonly", is_fixed.then(|| "true".to_owned()))
    };
    let element = element
        .put("class", format!("{class} {ink}"))
        .put("id", id)
        .set("tabindex", "-1")
        .maybe("aria-invalid", of_why("true"))
        .maybe(
            "aria-describedby",
            of_why(&why_id).filter(|_| editing.is_none()),
        );
    match editing {
        Some(editing) => element.child(editor(page, editing)),
        None => element.children(cell_content(cell, shown, row, why.map(|why| (why_id, why)))),
    }
    .done()
}

fn cell_content(
    cell: Cell,
    shown: &Shown,
    row: &Row,
    why: Option<(String, &String)>,
) -> Vec<AnyView> {
    let mut content = vec![
        tag("SPAN")
            .class("value")
            .say(shown.text().to_owned())
            .done(),
    ];
    if !shown.spoken().is_empty() {
        content.push(unseen(format!(", {}", shown.spoken())));
    }
    if let Some((id, why)) = why {
        content.push(
            tag("SPAN")
                .class("unseen")
                .put("id", id)
                .say(why.clone())
                .done(),
        );
    }
    if cell
        .column()
        .is_some_and(|column| column.content == Content::Marks)
    {
        content.extend(row.grades.iter().map(|grade| grade_mark(*grade)));
    }
    content
}

/// Why the text with which an edit began was refused; what is typed anew has not been refused yet.
fn why(page: Page, editing: &Editing) -> Option<String> {
    let system = untrack(|| page.system());
    let draft = page.peek(|document| document.drafts.get(&editing.place).cloned())?;
    (editing.how == How::Whole).then(|| why_refused(editing.place.field, &draft, system))
}

/// The control in which a cell is edited.
fn editor(page: Page, editing: &Editing) -> AnyView {
    let place = editing.place;
    let shape = spec(place.field).shape;
    let name = page.peek(|document| spot::Spot::Field(place).name(document));
    let is_refused = why(page, editing).is_some();
    let of_why = |value: &str| is_refused.then(|| value.to_owned());
    let named = |control: Markup| {
        control
            .id(EDITOR)
            .put("aria-label", name)
            .maybe("aria-invalid", of_why("true"))
            .maybe("aria-describedby", of_why(EDITOR_WHY))
    };
    if let (How::List, Shape::Choice(offered)) = (editing.how, shape) {
        let picked = page.peek(|document| {
            let record = document.sheet.record(place.holder)?;
            record.choice(place.field)
        });
        let first = untrack(|| unchosen(&shown(page, place, Writing::Bare)));
        return named(tag("SELECT"))
            .children(options(first, offered, picked))
            .done();
    }
    let text = editing.text.clone();
    named(tag("INPUT"))
        .set("type", "text")
        .set("inputmode", keypad(shape))
        .set("autocomplete", "off")
        .set("spellcheck", "false")
        .value(move || text.clone())
        .done()
}
