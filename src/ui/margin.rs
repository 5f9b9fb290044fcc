//! The margin: totals against their limits, then the margin notes, stops first.

use super::figure;
use super::go_to;
use super::markup::{button, each, live, nothing, several, tag};
use super::notes::Key;
use super::shown::{Shown, grade_mark, mark};
use super::spot::Spot;
use super::state::Page;
use crate::browser::page as window;
use crate::sheet::Edit;
use crate::words::{self, TotalWords, page};
use crate::work::{Total, TotalKind, Verdict};
use crate::working::{Holder, HolderId, Ink, MarginNote};
use leptos::prelude::*;

/// The id of the margin.
pub(super) const MARGIN: &str = "margin";

/// The margin.
pub(super) fn margin(page: Page) -> AnyView {
    let next = button(move || step(page, Way::On))
        .class("quiet")
        .say(format!("{} ", page::next_note()))
        .with(tag("KBD").text("F8"));
    let notes = each(
        move || page.notes.with(|notes| notes.keys()),
        |key| key.id(),
        note_view,
        page,
    );
    tag("ASIDE")
        .id(MARGIN)
        .live("class", move || {
            let class = if page.is_margin_open.get() {
                "margin open"
            } else {
                "margin"
            };
            Some(class.to_owned())
        })
        .set("aria-label", page::margin_label())
        .with(tag("H2").class("unseen").text(page::heading_totals()))
        .child(totals(page))
        .with(
            tag("DIV")
                .class("notes-head")
                .with(
                    tag("H2")
                        .id("notes-head")
                        .set("tabindex", "-1")
                        .live_text(move || page.notes.with(|notes| notes.counts())),
                )
                .with(next),
        )
        .with(
            tag("OL")
                .class("notes")
                .set("aria-label", page::notes_label())
                .child(notes),
        )
        .done()
}

fn totals(page: Page) -> AnyView {
    let head = [
        page::head_total(),
        page::head_running(),
        page::head_connected(),
        page::head_verdict(),
    ];
    let head = head.map(|head| tag("TH").set("scope", "col").text(head).done());
    let rows = each(
        move || {
            page.worked
                .with(|worked| worked.totals.iter().map(|total| total.kind).collect())
        },
        |kind| format!("{kind:?}"),
        total_view,
        page,
    );
    tag("TABLE")
        .class("totals")
        .with(tag("THEAD").class("unseen").with(tag("TR").children(head)))
        .with(tag("TBODY").child(rows))
        .done()
}

/// One of the totals, with its texts.
fn total<T>(page: Page, kind: TotalKind, read: impl Fn(&Total, TotalWords) -> T) -> Option<T> {
    let system = page.system();
    page.worked.with(|worked| {
        let total = worked.totals.iter().find(|total| total.kind == kind)?;
        Some(read(total, words::total_words(total, system)))
    })
}

/// What a total is.
pub(super) fn total_value(page: Page, spot: Spot) -> Shown {
    let Spot::Total(kind) = spot else {
        return Shown::Nothing;
    };
    let value = total(page, kind, |total, texts| {
        let ink = total
            .figure
            .as_ref()
            .map_or(Ink::Worked, |figure| figure.ink);
        texts.running.map(|text| Shown::Value(ink, text))
    });
    value.flatten().unwrap_or(Shown::Nothing)
}

fn total_view(page: Page, kind: TotalKind) -> AnyView {
    let limit = move || {
        let limit = total(page, kind, |_, texts| texts.limit).flatten();
        limit.map_or_else(String::new, |limit| {
            page::limit_of(words::limit(kind), &limit)
        })
    };
    let connected = move || {
        let connected = total(page, kind, |_, texts| texts.connected).flatten();
        connected.unwrap_or_default()
    };
    let verdict = live(move || {
        let verdict = total(page, kind, |total, _| total.verdict);
        verdict.map_or_else(nothing, verdict_mark)
    });
    let name = words::total(kind);
    let has_nothing = move || {
        let nothing = total(page, kind, |total, _| {
            total.running.is_none() && total.verdict == Verdict::NoLimit
        });
        nothing.unwrap_or(true)
    };
    tag("TR")
        .hidden(has_nothing)
        .with(
            tag("TH")
                .set("scope", "row")
                .say(format!("{name} "))
                .with(tag("SMALL").live_text(limit)),
        )
        .with(
            tag("TD")
                .class("number")
                .child(figure::framed(page, Spot::Total(kind), name, total_value))
                .with(tag("SMALL").class("connected").live_text(connected)),
        )
        .with(tag("TD").child(verdict))
        .done()
}

/// The mark of a verdict: its shape and its word.
pub(super) fn verdict_mark(verdict: Verdict) -> AnyView {
    let class = match verdict {
        Verdict::Within => "mark within",
        Verdict::Beyond => "mark beyond",
        Verdict::Unknown => "mark unknown",
        Verdict::NoLimit => return nothing(),
    };
    mark(class, words::verdict(verdict))
}

fn note_view(page: Page, key: Key) -> AnyView {
    let id = key.id();
    let answer_id = format!("{id}-answer");
    let place = key.place;
    // Figures are not compared: what a note says is in its kind.
    let note = Memo::new(move |_| {
        page.notes.with(|notes| {
            let note = notes.get(key)?;
            Some((note.grade, note.kind.clone()))
        })
    });
    let said = live(move || {
        let system = page.system();
        let note = note.with(|note| {
            let (grade, kind) = note.clone()?;
            Some(MarginNote::new(grade, key.place.field, kind).held_by(key.place.holder))
        });
        let Some(note) = note else {
            return nothing();
        };
        let words = words::note(&note, system);
        several(vec![
            grade_mark(note.grade),
            tag("P")
                .with(tag("B").say(words.what))
                .say(format!(" {} ", words.why))
                .with(tag("SPAN").class("remedy").say(words.remedy))
                .done(),
        ])
    });
    let at = move || {
        let at = page
            .names
            .with(|names| words::place(&place, |id| names.get(&id).cloned().unwrap_or_default()));
        format!("{}: {at}", page::go_to_subject())
    };
    let answer = move || {
        page.answers
            .with(|answers| answers.get(&key.note_ref()).cloned())
            .unwrap_or_default()
    };
    tag("LI")
        .put("id", id)
        .class("note-item")
        .set("tabindex", "-1")
        .child(said)
        .with(
            tag("DIV").class("note-foot").with(
                button(move || go_to::place(page, place))
                    .class("quiet go-to")
                    .live_text(at),
            ),
        )
        .with(
            tag("LABEL")
                .class("unseen")
                .put("for", answer_id.clone())
                .text(page::answer()),
        )
        .with(
            tag("INPUT")
                .class("answer")
                .put("id", answer_id)
                .set("type", "text")
                .set("autocomplete", "off")
                .set("placeholder", page::answer_placeholder())
                .value(answer)
                .on("change", move |event| {
                    if let Some(text) = window::typed(event.target()) {
                        page.edit(Edit::Answer(key.note_ref(), text.trim().to_owned()));
                    }
                }),
        )
        .done()
}

/// Which way to go through the notes.
#[derive(Clone, Copy, PartialEq, Eq)]
pub(super) enum Way {
    On,
    Back,
}

/// Goes to the next or the previous note; from anywhere else, to the one gone from last.
pub(super) fn step(page: Page, way: Way) {
    let ids: Vec<String> = page
        .notes
        .with_untracked(|notes| notes.keys().into_iter().map(Key::id).collect());
    if ids.is_empty() {
        page.say(page::no_notes().to_owned());
        return;
    }
    let here = window::focused_within(".note-item");
    let last = page.note.get_untracked();
    let is_away = here.is_none();
    let at = here
        .or(last)
        .and_then(|id| ids.iter().position(|known| *known == id));
    let next = match (at, way) {
        (None, _) => None,
        // Back from the subject to its note.
        (Some(at), Way::Back) if is_away => Some(at),
        (Some(at), Way::On) => Some(at + 1),
        (Some(at), Way::Back) => at.checked_sub(1),
    };
    // Behind the last note comes the first again.
    let id = next.and_then(|next| ids.get(next)).or(match way {
        Way::On => ids.first(),
        Way::Back => ids.last(),
    });
    if let Some(id) = id {
        show(page, id.clone());
    }
}

/// Goes to the first note of a feeder.
pub(super) fn go_to_note_of(page: Page, feeder: HolderId) {
    let id = page.notes.with_untracked(|notes| {
        notes
            .keys()
            .into_iter()
            .find(|key| key.place.holder == Holder::Feeder(feeder))
            .map(Key::id)
    });
    match id {
        Some(id) => show(page, id),
        None => page.say(page::no_notes().to_owned()),
    }
}

fn show(page: Page, id: String) {
    page.is_margin_open.set(true);
    page.note.set(Some(id.clone()));
    window::focus_soon(id);
}
