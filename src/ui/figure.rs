//! Worked values outside the grid: each a button whose working is read in the strip.

use super::markup::{tag, unseen};
use super::shown::{Shown, text_with_unit};
use super::spot::Spot;
use super::state::Page;
use leptos::prelude::*;

/// What stands at a spot, with its unit.
pub(super) fn at(page: Page, spot: Spot) -> Shown {
    let system = page.system();
    page.worked.with(|worked| match spot.traced(worked) {
        Some(traced) => Shown::Value(traced.ink(), text_with_unit(&traced, system)),
        None => Shown::Nothing,
    })
}

/// A worked value: a button which puts its working into the strip.
pub(super) fn figure(page: Page, spot: Spot, name: &str) -> AnyView {
    framed(page, spot, name, at)
}

/// As [`figure`], with a text of its own.
pub(super) fn framed(
    page: Page,
    spot: Spot,
    name: &str,
    value: fn(Page, Spot) -> Shown,
) -> AnyView {
    let show = move || page.spot.set(Some(spot));
    tag("BUTTON")
        .set("type", "button")
        .live("class", move || {
            Some(format!("figure {}", value(page, spot).class()))
        })
        .claim("aria-current", move || {
            page.pinned.get().or(page.spot.get()) == Some(spot)
        })
        .on("focus", move |_| show())
        .on("click", move |_| show())
        .child(unseen(format!("{name} ")))
        .live_text(move || value(page, spot).text().to_owned())
        .with(
            tag("SPAN")
                .class("unseen")
                .live_text(move || match value(page, spot).spoken() {
                    "" => String::new(),
                    spoken => format!(", {spoken}"),
                }),
        )
        .done()
}

/// Worked values with their names; those without a value are left out.
pub(super) fn figures(page: Page, spots: impl Iterator<Item = (Spot, String)>) -> AnyView {
    let lines = spots.map(|(spot, name)| {
        tag("DIV")
            .hidden(move || at(page, spot) == Shown::Nothing)
            .with(tag("DT").say(name.clone()))
            .with(tag("DD").child(figure(page, spot, &name)))
            .done()
    });
    tag("DL").class("figures").children(lines).done()
}
