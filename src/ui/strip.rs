//! The working strip at the foot of the window: how the value under the cursor came about.

use super::field::{shown, why_refused};
use super::figure;
use super::markup::{button, formula, live, several, tag, unseen};
use super::shown::{Shown, Writing, ink_class};
use super::spot::Spot;
use super::state::Page;
use crate::words::{self, TermLine, WorkingLine, page};
use crate::working::{Field, Ink, Origin, Place};
use leptos::prelude::*;

/// What the strip shows.
#[derive(Clone, PartialEq)]
struct Reading {
    name: String,
    value: Shown,
    /// The steps, where the value was worked.
    lines: Vec<WorkingLine>,
    /// What there is to say where it was not.
    text: String,
}

/// The strip.
pub(super) fn strip(page: Page) -> AnyView {
    let read_now = move || read(page, page.pinned.get().or(page.spot.get())?);
    let is_pinned = move || page.pinned.with(Option::is_some);
    let is_open = move || page.is_chain_open.get();
    let content = live(move || match read_now() {
        Some(reading) => several(reading_view(&reading, is_open())),
        None => tag("DIV")
            .class("read")
            .with(tag("B").text(page::strip_empty()))
            .done(),
    });
    let chain_button = button(move || page.is_chain_open.update(|is_open| *is_open = !*is_open))
        .class("quiet")
        .id("show-chain")
        .claim("aria-pressed", is_open)
        .live_text(move || {
            let text = if is_open() {
                page::strip_short()
            } else {
                page::strip_whole()
            };
            format!("{text} ")
        })
        .with(tag("KBD").text(page::key_space()));
    let pin_button = button(move || pin(page))
        .class("quiet")
        .id("pin-working")
        .claim("aria-pressed", is_pinned)
        .live_text(move || {
            let text = if is_pinned() {
                page::strip_unpin()
            } else {
                page::strip_pin()
            };
            format!("{text} ")
        })
        .with(tag("KBD").text("P"));
    tag("SECTION")
        .id("strip")
        .live("class", move || {
            let open = if is_open() { " open" } else { "" };
            let pinned = if is_pinned() { " pinned" } else { "" };
            Some(format!("strip{open}{pinned}"))
        })
        .set("aria-label", page::strip_label())
        .with(tag("DIV").class("reading").child(content))
        .with(tag("DIV").class("hold").with(chain_button).with(pin_button))
        .done()
}

fn reading_view(reading: &Reading, is_open: bool) -> Vec<AnyView> {
    let value = &reading.value;
    let shown = if is_open { reading.lines.len() } else { 1 };
    let steps = reading
        .lines
        .iter()
        .take(shown)
        .enumerate()
        .map(|(position, line)| step(line, position > 0, is_open));
    let is_silent = reading.text.is_empty();
    vec![
        tag("DIV")
            .class("read")
            .with(tag("B").say(reading.name.clone()))
            .with(
                tag("SPAN")
                    .put("class", format!("value {}", value.class()))
                    .say(value.text().to_owned()),
            )
            .child(unseen(format!(" {}", value.spoken())))
            .done(),
        tag("DIV")
            .class("chain")
            .set("tabindex", "0")
            .set("role", "group")
            .set("aria-label", page::heading_working())
            .with(
                tag("P")
                    .class("said")
                    .hidden(move || is_silent)
                    .say(reading.text.clone()),
            )
            .with(tag("OL").class("steps").children(steps))
            .done(),
    ]
}

/// Pins what is read, or lets the strip follow the cursor again.
pub(super) fn pin(page: Page) {
    let pinned = match page.pinned.get_untracked() {
        Some(_) => None,
        None => page.spot.get_untracked(),
    };
    page.pinned.set(pinned);
}

fn read(page: Page, spot: Spot) -> Option<Reading> {
    let system = page.system();
    let name = page.with(|document| spot.name(document));
    if let Spot::Field(place) = spot {
        return Some(read_field(page, place, name));
    }
    let mut reading = Reading {
        name,
        value: value_at(page, spot),
        lines: Vec::new(),
        text: String::new(),
    };
    let traced = page.worked.with(|worked| spot.traced(worked));
    match traced.map(|traced| traced.origin) {
        Some(Origin::Figure(figure)) => reading.lines = words::working(&figure, system),
        Some(Origin::Entered(_)) => reading.text = page::strip_entered().to_owned(),
        Some(Origin::Assumed(field)) => reading.text = because(field),
        Some(Origin::Constant) => {}
        None => reading.text = page::cannot_be_worked().to_owned(),
    }
    let found = page.worked.with(|worked| {
        spot.conductors(worked)
            .map(|run| words::size_found(run, system))
    });
    if let Some(found) = found {
        reading.text = found;
    }
    Some(reading)
}

/// The value at a spot; of a total, as it stands in the margin.
fn value_at(page: Page, spot: Spot) -> Shown {
    match spot {
        Spot::Total(_) => super::margin::total_value(page, spot),
        _ => figure::at(page, spot),
    }
}

fn read_field(page: Page, place: Place, name: String) -> Reading {
    let system = page.system();
    let value = shown(page, place, Writing::WithUnit);
    let text = match &value {
        Shown::Refused(text) => why_refused(place.field, text, system),
        Shown::Value(Ink::Assumed, _) => because(place.field),
        Shown::Value(Ink::Entered, _) => page::strip_entered().to_owned(),
        Shown::Value(Ink::Worked, _) => String::new(),
        Shown::Nothing => page::accepts(&words::accepted(place.field, system)),
    };
    Reading {
        name,
        value,
        lines: Vec::new(),
        text,
    }
}

fn because(field: Field) -> String {
    page::assumed_because(words::assumption_reason(field))
}

/// One step: the rule in symbols, the numbers put into it, its source, and where each number came from.
fn step(line: &WorkingLine, has_title: bool, has_terms: bool) -> AnyView {
    let mut step = tag("LI");
    if has_title {
        step = step.with(
            tag("B")
                .class("step-title")
                .say(format!("{}: ", line.title)),
        );
    }
    let source = match line.note.as_str() {
        "" => line.source.clone(),
        note => format!("{}; {note}", line.source),
    };
    step = step
        .with(
            tag("SPAN")
                .class("formula")
                .children(formula(&line.formula)),
        )
        .text(" ")
        .with(
            tag("SPAN")
                .class("numbers")
                .children(formula(&line.numbers)),
        )
        .text(" ")
        .with(tag("CITE").say(source));
    if has_terms {
        step = step.with(
            tag("UL")
                .class("terms")
                .children(line.terms.iter().map(term)),
        );
    }
    step.done()
}

fn term(term: &TermLine) -> AnyView {
    tag("LI")
        .with(tag("I").children(formula(&term.symbol)))
        .say(format!(" {} ", term.meaning))
        .with(
            tag("SPAN")
                .put(
                    "class",
                    format!("value {}", term.ink.map_or("constant", ink_class)),
                )
                .say(term.value.clone()),
        )
        .text(" ")
        .with(tag("SMALL").say(term.origin.clone()))
        .done()
}
