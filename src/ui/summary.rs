//! What stands around the figures: cautions, the welcome of an empty sheet, the key of the inks, the incoming circuit's
//! figures, what is assumed, the list of keys.

use super::bar;
use super::demos::DEMOS;
use super::figure::figures;
use super::go_to;
use super::markup::{button, live, nothing, several, tag};
use super::shown::ink_class;
use super::spot::{PanelPart, Spot};
use super::state::Page;
use crate::browser::page as window;
use crate::words::{self, page};
use crate::working::{Caution, Ink, Place};
use leptos::prelude::*;

/// The id of the list of keys.
const KEYS: &str = "keys-list";

/// Every caution in full.
pub(super) fn caution_texts() -> Vec<AnyView> {
    Caution::ALL
        .into_iter()
        .map(|known| {
            let words = words::caution(known);
            tag("P")
                .with(tag("B").say(format!("{}. ", words.heading)))
                .text(words.text)
                .done()
        })
        .collect()
}

/// The cautions: one line which opens, and never goes away.
pub(super) fn cautions(page: Page) -> AnyView {
    // In full while the sheet is empty, until the person says otherwise.
    let chosen = RwSignal::new(None);
    let is_open = move || {
        chosen
            .get()
            .unwrap_or_else(|| page.with(|document| document.sheet.is_empty()))
    };
    let toggle = button(move || chosen.set(Some(!untrack(is_open))))
        .class("quiet")
        .id("toggle-cautions")
        .claim("aria-expanded", is_open)
        .live_text(move || {
            let text = if is_open() {
                page::caution_shrink()
            } else {
                page::caution_open()
            };
            text.to_owned()
        });
    let texts = tag("DIV")
        .with(tag("P").hidden(is_open).text(words::caution_line()))
        .with(
            tag("DIV")
                .class("all")
                .hidden(move || !is_open())
                .children(caution_texts()),
        );
    tag("DIV")
        .class("caution")
        .set("role", "note")
        .set("aria-label", page::caution_label())
        .with(tag("I").class("sign").set("aria-hidden", "true"))
        .with(texts)
        .with(toggle)
        .done()
}

/// What an empty sheet says of itself.
pub(super) fn welcome(page: Page) -> AnyView {
    let is_empty = Memo::new(move |_| {
        page.with(|document| document.sheet.is_empty() && document.drafts.is_empty())
    });
    live(move || {
        if !is_empty.get() {
            return nothing();
        }
        let demos = DEMOS.iter().map(|demo| {
            button(move || bar::open_demo(page, demo))
                .class("demo")
                .text(demo.name)
                .done()
        });
        tag("DIV")
            .class("welcome")
            .id("welcome")
            .with(tag("P").text(page::empty_sheet()))
            .with(tag("DIV").class("tools").children(demos))
            .done()
    })
}

/// How the inks are marked.
pub(super) fn ink_key() -> AnyView {
    let inks = [
        (Ink::Entered, page::ink_key_entered()),
        (Ink::Assumed, page::ink_key_assumed()),
        (Ink::Worked, page::ink_key_worked()),
    ];
    let inks = inks.map(|(ink, text)| {
        let class = format!("value {}", ink_class(ink));
        tag("LI")
            .with(tag("SPAN").put("class", class).text(text))
            .done()
    });
    tag("UL")
        .class("ink-key")
        .set("aria-label", page::ink_key_label())
        .children(inks)
        .done()
}

/// The worked figures of the incoming circuit and of the fault current.
pub(super) fn panel_figures(page: Page) -> AnyView {
    let spots = PanelPart::all()
        .into_iter()
        .map(|part| (Spot::Panel(part), part.name()));
    figures(page, spots)
}

/// What is assumed, each with the way to its field.
pub(super) fn assumptions(page: Page) -> AnyView {
    let count = move || {
        let count = page.worked.with(|worked| worked.assumptions.len());
        format!(
            "{}: {}",
            page::heading_assumptions(),
            page::assumption_count(count)
        )
    };
    // A large sheet assumes thousands of values: they are written only to be read.
    let is_open = RwSignal::new(false);
    let heads = [
        page::head_field(),
        page::head_value(),
        page::head_reason(),
        page::head_of(),
    ];
    let heads = heads.map(|head| tag("TH").set("scope", "col").text(head).done());
    let table = tag("TABLE")
        .with(tag("THEAD").with(tag("TR").children(heads)))
        .with(tag("TBODY").child(live(move || {
            if is_open.get() {
                several(assumption_rows(page))
            } else {
                nothing()
            }
        })));
    tag("DETAILS")
        .class("assumptions")
        .on("toggle", move |event| {
            is_open.set(window::is_open(event.target()));
        })
        .with(tag("SUMMARY").live_text(count))
        .with(table)
        .done()
}

fn assumption_rows(page: Page) -> Vec<AnyView> {
    let system = page.system();
    page.worked.with(|worked| {
        let assumed = &worked.assumptions;
        let lines = page.names.with(|names| {
            words::assumption_lines(assumed, system, |id| {
                names.get(&id).cloned().unwrap_or_default()
            })
        });
        lines
            .into_iter()
            .map(|line| {
                let first = assumed.iter().find(|known| {
                    let field = known.place.field;
                    words::label(field) == line.label
                        && words::assumed_with_unit(field, &known.value, system) == line.value
                });
                let place: Option<Place> = first.map(|known| known.place);
                let go = button(move || {
                    if let Some(place) = place {
                        go_to::place(page, place);
                    }
                });
                let value = tag("SPAN").class("value assumed").say(line.value);
                tag("TR")
                    .with(
                        tag("TH")
                            .set("scope", "row")
                            .with(go.class("quiet").text(line.label)),
                    )
                    .with(tag("TD").with(value))
                    .with(tag("TD").text(line.reason))
                    .with(tag("TD").say(line.holders.join(", ")))
                    .done()
            })
            .collect()
    })
}

/// The list of keys.
pub(super) fn keys() -> AnyView {
    let table = |head: &'static str, keys: &[(&'static str, &'static str)]| {
        let rows = keys.iter().map(|(key, text)| {
            tag("TR")
                .with(tag("TH").set("scope", "row").with(tag("KBD").text(key)))
                .with(tag("TD").text(text))
                .done()
        });
        tag("TABLE")
            .with(tag("CAPTION").text(head))
            .with(tag("TBODY").children(rows))
    };
    tag("DIALOG")
        .id(KEYS)
        .class("keys")
        .set("aria-labelledby", "keys-head")
        .with(tag("H2").id("keys-head").text(page::keys_title()))
        .with(
            tag("DIV")
                .class("two")
                .with(table(page::keys_where_grid(), page::grid_keys()))
                .with(table(page::keys_where_page(), page::page_keys())),
        )
        .with(
            button(|| window::close_dialog(KEYS))
                .class("main")
                .text(page::close()),
        )
        .done()
}

/// Opens the list of keys.
pub(super) fn show_keys() {
    window::open_dialog(KEYS);
}
