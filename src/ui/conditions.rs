//! The title block and the conditions: sentences which open as labelled lists.

use super::field::{control_id, field, shown};
use super::markup::{self, Markup, button, live, several, tag, unseen};
use super::shown::{Shown, Writing};
use super::state::Page;
use crate::browser::page as window;
use crate::sheet::{Shape, spec};
use crate::words::{self, Piece, page};
use crate::working::{Field, Holder, Ink, Place};
use leptos::prelude::*;

/// A group of fields of the sheet which opens as one list.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Group {
    Title,
    Supply,
    Incoming,
    Enclosure,
}

impl Group {
    const ALL: [Group; 4] = [
        Group::Title,
        Group::Supply,
        Group::Incoming,
        Group::Enclosure,
    ];

    /// The sentences of the group; the title block has none.
    pub(super) fn sentences(self) -> Vec<Vec<Piece>> {
        match self {
            Group::Title => Vec::new(),
            Group::Supply => vec![words::supply_sentence()],
            Group::Incoming => vec![words::incoming_sentence(), words::main_sentence()],
            Group::Enclosure => vec![words::enclosure_sentence()],
        }
    }

    fn fields(self) -> Vec<Field> {
        match self {
            Group::Title => words::title_block().to_vec(),
            _ => self
                .sentences()
                .iter()
                .flat_map(|sentence| words::fields(sentence))
                .collect(),
        }
    }

    /// The group with this field of the sheet.
    pub(super) fn of(field: Field) -> Option<Self> {
        Self::ALL
            .into_iter()
            .find(|group| group.fields().contains(&field))
    }

    const fn id(self) -> &'static str {
        match self {
            Group::Title => "fill-in-title",
            Group::Supply => "fill-in-supply",
            Group::Incoming => "fill-in-incoming",
            Group::Enclosure => "fill-in-enclosure",
        }
    }

    const fn head(self) -> &'static str {
        match self {
            Group::Title => page::heading_title(),
            Group::Supply => page::heading_supply(),
            Group::Incoming => page::heading_incoming(),
            Group::Enclosure => page::heading_enclosure(),
        }
    }
}

const fn of_sheet(field: Field) -> Place {
    Place {
        holder: Holder::Sheet,
        field,
    }
}

/// Opens a group and goes to one of its fields, or to the first.
pub(super) fn open(page: Page, group: Group, field: Option<Field>) {
    page.group.set(Some(group));
    if let Some(field) = field.or(group.fields().first().copied()) {
        window::focus_soon(control_id(of_sheet(field)));
    }
}

fn close(page: Page, group: Group) {
    page.group.set(None);
    window::focus_soon(group.id().to_owned());
}

/// The conditions of a group: its sentences, or its open list.
pub(super) fn conditions(page: Page, group: Group) -> AnyView {
    let is_open = Memo::new(move |_| page.group.get() == Some(group));
    live(move || match (is_open.get(), group) {
        (true, _) => list(page, group),
        (false, Group::Title) => title_block(page),
        (false, _) => {
            let sentences = group.sentences();
            let last = sentences.len().saturating_sub(1);
            let sentences = sentences
                .into_iter()
                .enumerate()
                .map(|(position, sentence)| {
                    let view = sentence_view(page, group, sentence);
                    if position == last {
                        view.text(" ").child(open_button(page, group)).done()
                    } else {
                        view.done()
                    }
                });
            several(sentences.collect())
        }
    })
}

/// The title block: the name of the sheet and what identifies it.
fn title_block(page: Page) -> AnyView {
    let text = move |field| page.with(|document| document.sheet.record.text(field).to_owned());
    let heading = tag("H1")
        .id("title-head")
        .set("tabindex", "-1")
        .live("class", move || {
            text(Field::SheetName)
                .is_empty()
                .then(|| "untitled".to_owned())
        })
        .live_text(move || match text(Field::SheetName) {
            name if name.is_empty() => page::untitled().to_owned(),
            name => name,
        });
    let parts = words::title_block()
        .iter()
        .copied()
        .filter(|field| !matches!(field, Field::SheetName | Field::Remark))
        .map(|field| {
            let value = live(move || {
                let shown = shown(page, of_sheet(field), Writing::WithUnit);
                value_view(page, Group::Title, field, &or_usual(field, shown))
            });
            tag("DIV")
                .with(tag("DT").text(words::head(field)))
                .with(tag("DD").child(value))
                .done()
        });
    several(vec![
        tag("DIV")
            .class("title")
            .with(heading)
            .with(tag("DL").children(parts))
            .child(open_button(page, Group::Title))
            .done(),
        tag("P")
            .class("remark entered")
            .hidden(move || text(Field::Remark).is_empty())
            .live_text(move || text(Field::Remark))
            .done(),
    ])
}

/// A choice of the title block which nobody made stands at its first answer.
fn or_usual(field: Field, shown: Shown) -> Shown {
    match (shown, spec(field).shape) {
        (Shown::Nothing, Shape::Choice([first, ..])) => {
            Shown::Value(Ink::Assumed, words::choice(*first).to_owned())
        }
        (shown, _) => shown,
    }
}

fn open_button(page: Page, group: Group) -> AnyView {
    button(move || open(page, group, None))
        .class("quiet")
        .id(group.id())
        .set("aria-expanded", "false")
        .text(page::sentence_open())
        .child(unseen(format!(": {}", group.head())))
        .done()
}

fn sentence_view(page: Page, group: Group, sentence: Vec<Piece>) -> Markup {
    let pieces = sentence.into_iter().map(|piece| match piece {
        Piece::Text(text) => markup::words(text.to_owned()),
        Piece::Field(field) => live(move || {
            let shown = shown(page, of_sheet(field), Writing::InSentence);
            value_view(page, group, field, &shown)
        }),
    });
    tag("P").class("sentence").children(pieces)
}

/// A value within a sentence: a click fills it in.
fn value_view(page: Page, group: Group, field: Field, value: &Shown) -> AnyView {
    let text = match value {
        Shown::Nothing if group == Group::Title => "–",
        Shown::Nothing => words::gap(field),
        value => value.text(),
    };
    let view = tag("SPAN")
        .put("class", format!("value {}", value.class()))
        .on("click", move |_| open(page, group, Some(field)))
        .say(text.to_owned());
    match value.spoken() {
        "" => view,
        spoken => view.child(unseen(format!(" ({spoken})"))),
    }
    .done()
}

fn list(page: Page, group: Group) -> AnyView {
    let fields = group
        .fields()
        .into_iter()
        .map(|of| field(page, of_sheet(of)));
    tag("SECTION")
        .class("form open-list")
        .set("aria-label", group.head())
        .on("keydown", move |event| {
            if window::key(&event).is_some_and(|key| key.name == "Escape") {
                window::take(&event);
                close(page, group);
            }
        })
        .with(tag("DIV").class("fields").children(fields))
        .with(
            button(move || close(page, group))
                .class("main")
                .text(page::sentence_close()),
        )
        .done()
}
