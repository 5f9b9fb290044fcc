//! The page: components and signals over one document with its history.
//!
//! Here: what is shown and what a key or a click does. Not here: sentences (`words`), arithmetic, and the browser's own
//! interfaces (`browser`). A component is a function from signals to markup. Start with [`start`].

mod bar;
mod columns;
mod conditions;
mod demos;
mod feeders;
mod field;
mod figure;
mod form;
mod go_to;
mod grid;
mod keep;
mod keys;
mod ledger;
mod margin;
mod markup;
mod names;
mod notes;
mod print;
mod shared;
mod shown;
mod spot;
mod state;
mod strip;
mod summary;

use crate::browser::page::{self as window, Event};
use crate::browser::{self, files, panic};
use crate::words::page;
use conditions::Group;
use leptos::prelude::*;
use margin::Way;
use markup::{Markup, button, several, tag};
use state::Page;

/// Puts the page into its place and starts it.
pub fn start() {
    panic::watch(keep::RESCUE);
    let Some(place) = window::element("app") else {
        return;
    };
    leptos::mount::mount_to(place, sheet).forget();
    // The page itself does not scroll: keys which scroll are to reach the part which does.
    window::focus(PAD);
}

/// Where the working strip belongs to: a single letter is a command there alone, lest a spoken word be taken for one.
const READ_FROM: [&str; 5] = ["#strip", ".grid", ".ledger", ".totals", ".figures"];

/// The id of the part which scrolls.
const PAD: &str = "pad";

fn sheet() -> AnyView {
    let page = Page::start();
    watch(page);
    let pad = tag("DIV")
        .class("pad")
        .id(PAD)
        .set("tabindex", "-1")
        .child(conditions::conditions(page, Group::Title))
        .child(summary::cautions(page))
        .child(summary::welcome(page))
        .with(
            section("supply", page::heading_supply())
                .child(conditions::conditions(page, Group::Supply))
                .child(summary::ink_key()),
        )
        .child(feeders::feeders(page))
        .with(
            section("incoming", page::heading_incoming())
                .child(conditions::conditions(page, Group::Incoming))
                .child(summary::panel_figures(page)),
        )
        .with(
            section("enclosure", page::heading_enclosure())
                .child(conditions::conditions(page, Group::Enclosure))
                .with(
                    tag("DIV")
                        .class("two")
                        .child(ledger::ledger(page))
                        .child(ledger::air(page)),
                )
                .child(ledger::sources(page)),
        )
        .with(
            section("summary", page::heading_summary())
                .child(summary::assumptions(page))
                .with(
                    tag("DIV")
                        .class("tools")
                        .with(button(window::print).class("main").text(page::print()))
                        .with(tag("SMALL").text(page::print_page_numbers())),
                )
                .with(tag("P").class("version").say(format!(
                    "{} {}",
                    page::program(),
                    window::build()
                ))),
        );
    several(vec![
        bar::bar(page),
        tag("MAIN")
            .class("sheet")
            .with(pad)
            .child(margin::margin(page))
            .done(),
        strip::strip(page),
        summary::keys(),
        tag("P")
            .class("unseen")
            .id("aloud")
            .set("role", "status")
            .set("aria-live", "polite")
            .live_text(move || page.aloud.get())
            .done(),
        tag("DIV").id(print::PAPER).class("paper").done(),
    ])
}

/// A part of the sheet with its heading.
fn section(id: &'static str, heading: &'static str) -> Markup {
    let head = format!("{id}-head");
    tag("SECTION")
        .id(id)
        .put("aria-labelledby", head.clone())
        .with(
            tag("H2")
                .put("id", head)
                .set("tabindex", "-1")
                .text(heading),
        )
}

/// Listens to what happens outside of any component.
fn watch(page: Page) {
    page.peek(|document| window::set_title(&names::title(document)));
    page.keeping.watch_other_tabs();
    browser::on_next_frame(move || page.keeping.runs());
    browser::on_window("keydown", move |event| on_key(page, &event));
    browser::on_window("beforeprint", move |_| print::lay_out(page));
    browser::on_window("afterprint", move |_| print::clear_away());
    browser::on_window("dragover", |event| event.prevent_default());
    browser::on_window("drop", move |event| {
        event.prevent_default();
        files::read_dropped(&event, bar::LARGEST_FILE, move |picked| {
            bar::open(page, picked);
        });
    });
    browser::on_window("beforeunload", move |event| {
        if page.peek(|document| page.keeping.would_lose(document)) {
            event.prevent_default();
        }
    });
}

fn is_read_from() -> bool {
    READ_FROM
        .into_iter()
        .any(|part| window::focused_within(part).is_some())
}

/// Keys which work everywhere.
fn on_key(page: Page, event: &Event) {
    let Some(key) = window::key(event) else {
        return;
    };
    let name = key.name.to_lowercase();
    match (name.as_str(), key.control, key.shift) {
        ("f8", false, false) => margin::step(page, Way::On),
        ("f8", false, true) => margin::step(page, Way::Back),
        ("s", true, false) => bar::save(page),
        ("o", true, false) => bar::choose_file(),
        // Within a control these keys are the browser's own.
        _ if window::is_entering() => return,
        ("z", true, false) => page.undo(),
        ("y", true, false) | ("z", true, true) => page.redo(),
        ("p", false, false) if !key.alt && is_read_from() => {
            strip::pin(page);
        }
        _ => return,
    }
    event.prevent_default();
}
