//! The heat ledger with its bars, the other sources of heat, and the temperature and air that come of them.

use super::field::{control_id, field_control};
use super::figure::{self, figure};
use super::markup::{Markup, button, each, live, nothing, several, tag, unseen};
use super::names;
use super::shown::Shown;
use super::spot::{AirPart, Load, Spot};
use super::state::Page;
use crate::browser::page as window;
use crate::quantity::Power;
use crate::sheet::{Edit, Home, fields_of};
use crate::words::{self, page};
use crate::work::{LedgerGroup, Worked};
use crate::working::{Field, Figure, Holder, HolderId, Place};
use leptos::prelude::*;

/// The head of a column of numbers.
fn number_head(text: &'static str, unit: &'static str) -> Markup {
    tag("TH")
        .class("number")
        .set("scope", "col")
        .say(format!("{text} "))
        .with(tag("SMALL").text(unit))
}

fn number(content: AnyView) -> AnyView {
    tag("TD").class("number").child(content).done()
}

fn row_head(text: &'static str) -> Markup {
    tag("TH").set("scope", "row").text(text)
}

fn column_head(text: &'static str) -> Markup {
    tag("TH").set("scope", "col").text(text)
}

/// Every source of heat in the enclosure, in groups.
pub(super) fn ledger(page: Page) -> AnyView {
    let groups = move || {
        page.worked
            .with(|worked| worked.ledger.rows.iter().map(|row| row.group).collect())
    };
    let unit = page::unit_heat();
    let head = tag("TR")
        .with(column_head(page::heading_ledger()))
        .with(number_head(page::head_running(), unit))
        .with(number_head(page::head_connected(), unit))
        .with(
            tag("TH")
                .class("bars")
                .child(unseen(page::head_share().to_owned())),
        );
    let sum = tag("TR")
        .class("sum")
        .with(row_head(page::head_total()))
        .child(ledger_cell(page, None, Load::Running))
        .child(ledger_cell(page, None, Load::Connected))
        .with(tag("TD"));
    let advised = tag("TR")
        .hidden(move || figure::at(page, Spot::AdvisedReactors) == Shown::Nothing)
        .with(row_head(page::ledger_advised()))
        .child(bare_number(
            page,
            Spot::AdvisedReactors,
            page::ledger_advised(),
        ))
        .with(tag("TD"))
        .with(tag("TD"));
    tag("TABLE")
        .class("ledger")
        .set("aria-label", page::ledger_label())
        .with(tag("THEAD").with(head))
        .with(tag("TBODY").child(each(groups, |group| format!("{group:?}"), group_row, page)))
        .with(tag("TFOOT").with(sum).with(advised))
        .done()
}

fn group_row(page: Page, group: LedgerGroup) -> AnyView {
    let sources = move || {
        page.worked.with(|worked| {
            let row = worked.ledger.rows.iter().find(|row| row.group == group);
            row.map_or_else(String::new, |row| format!(" × {}", row.sources))
        })
    };
    tag("TR")
        .with(row_head(words::ledger_group(group)).with(tag("SMALL").live_text(sources)))
        .child(ledger_cell(page, Some(group), Load::Running))
        .child(ledger_cell(page, Some(group), Load::Connected))
        .with(
            tag("TD")
                .class("bars")
                .child(live(move || page.worked.with(|worked| bars(worked, group)))),
        )
        .done()
}

fn ledger_cell(page: Page, group: Option<LedgerGroup>, load: Load) -> AnyView {
    let name = group.map_or(page::head_total(), words::ledger_group);
    bare_number(page, Spot::Ledger(group, load), name)
}

/// A figure whose unit stands in the head of its column.
fn bare_number(page: Page, spot: Spot, name: &str) -> AnyView {
    number(figure::framed(page, spot, name, |page, spot| {
        let system = page.system();
        page.worked.with(|worked| match spot.traced(worked) {
            Some(traced) => super::shown::bare(&traced, system),
            None => Shown::Nothing,
        })
    }))
}

/// What runs together of a group, and everything connected of it, on the scale of the whole ledger. The browser does the
/// scaling.
fn bars(worked: &Worked, group: LedgerGroup) -> AnyView {
    let row = worked.ledger.rows.iter().find(|row| row.group == group);
    let whole = watts(&worked.ledger.connected);
    let (Some(row), Some(whole)) = (row, whole) else {
        return nothing();
    };
    let bar = |class: &'static str, figure: &Figure| {
        let value = watts(figure).unwrap_or_default();
        tag("PROGRESS")
            .class(class)
            .put("max", whole.to_string())
            .put("value", value.to_string())
            .done()
    };
    tag("DIV")
        .class("bar-pair")
        .set("aria-hidden", "true")
        .child(bar("running", &row.running))
        .child(bar("connected", &row.connected))
        .done()
}

fn watts(figure: &Figure) -> Option<f64> {
    let watts = figure.quantity::<Power>().map(Power::to_watts);
    watts.filter(|watts| *watts > 0.0)
}

/// Temperature and air, for what runs together and for everything connected.
pub(super) fn air(page: Page) -> AnyView {
    let rows = AirPart::ALL.into_iter().map(|part| {
        let running = Spot::Air(Load::Running, part);
        let connected = Spot::Air(Load::Connected, part);
        let name = part.name();
        tag("TR")
            .hidden(move || figure::at(page, running) == Shown::Nothing)
            .with(row_head(name))
            .child(number(figure(page, running, name)))
            .child(number(figure(page, connected, name)))
            .done()
    });
    let head = tag("TR")
        .with(column_head(page::heading_air()))
        .with(number_head(page::head_running(), ""))
        .with(number_head(page::head_connected(), ""));
    tag("TABLE")
        .class("ledger air")
        .with(tag("THEAD").with(head))
        .with(tag("TBODY").children(rows))
        .done()
}

fn ids(page: Page) -> Vec<HolderId> {
    page.with(|document| {
        let sources = &document.sheet.sources;
        sources.iter().map(|item| item.id).collect()
    })
}

/// The other sources of heat, each a row of fields.
pub(super) fn sources(page: Page) -> AnyView {
    let heads = live(move || {
        let system = page.system();
        let heads = fields_of(Home::Source).into_iter().map(|field| {
            column_head(words::head(field))
                .text(" ")
                .with(tag("SMALL").text(words::field_symbol(field, system)))
                .done()
        });
        several(heads.collect())
    });
    let head = tag("TR")
        .child(heads)
        .with(number_head(page::head_heat(), page::unit_heat()))
        .with(tag("TD"));
    let table = tag("TABLE")
        .class("sources")
        .set("aria-labelledby", "sources-head")
        .with(tag("THEAD").with(head))
        .with(tag("TBODY").child(each(
            move || ids(page),
            |id| id.0.to_string(),
            source_row,
            page,
        )));
    let add = move || {
        let id = HolderId(page.peek(|document| document.sheet.next_id));
        if page.edit(Edit::AddSource) {
            page.say(page::source_added().to_owned());
            window::focus_soon(control_id(name_of(id)));
        }
    };
    several(vec![
        tag("H3")
            .id("sources-head")
            .text(page::heading_sources())
            .done(),
        tag("DIV")
            .class("scroll")
            .hidden(move || ids(page).is_empty())
            .with(table)
            .done(),
        tag("P")
            .class("empty")
            .hidden(move || !ids(page).is_empty())
            .text(page::no_sources())
            .done(),
        tag("DIV")
            .class("tools")
            .with(button(add).id("add-source").text(page::add_source()))
            .done(),
    ])
}

const fn name_of(id: HolderId) -> Place {
    Place {
        holder: Holder::Source(id),
        field: Field::SourceName,
    }
}

fn source_row(page: Page, id: HolderId) -> AnyView {
    let holder = Holder::Source(id);
    let cells = fields_of(Home::Source).into_iter().map(|field| {
        tag("TD")
            .child(field_control(page, Place { holder, field }))
            .done()
    });
    let name = move || page.with(|document| names::holder(document, holder));
    let delete = button(move || delete_source(page, id))
        .class("quiet")
        .text(page::delete_feeder())
        .with(
            tag("SPAN")
                .class("unseen")
                .live_text(move || format!(" {}", name())),
        );
    tag("TR")
        .children(cells)
        .child(bare_number(page, Spot::Source(id), page::head_heat()))
        .with(tag("TD").with(delete))
        .done()
}

fn delete_source(page: Page, id: HolderId) {
    let (named, row) = page.peek(|document| {
        let sources = &document.sheet.sources;
        (
            names::holder(document, Holder::Source(id)),
            sources.iter().position(|item| item.id == id).unwrap_or(0),
        )
    });
    if page.edit(Edit::DeleteSource(id)) {
        page.say(page::source_deleted(&named));
        let next = page.peek(|document| {
            let rest = &document.sheet.sources;
            rest.get(row).or(rest.last()).map(|item| item.id)
        });
        window::focus_soon(match next {
            Some(next) => control_id(name_of(next)),
            None => "add-source".to_owned(),
        });
    }
}
