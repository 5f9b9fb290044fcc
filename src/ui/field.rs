//! One field of a form: label, control, unit, and beside it what is assumed, what was refused and what is accepted.

use super::markup::{self, Markup, live, several, tag};
use super::shown::{Holding, Shown, Writing, ink_class};
use super::spot::{FeederPart, PanelPart, RunPart, Spot};
use super::state::{Page, Taken};
use crate::browser::page::{self as window, Event};
use crate::entry;
use crate::file;
use crate::sheet::{Choice, Edit, Entry, Shape, UnitSystem, spec};
use crate::words::{self, page};
use crate::working::{Field, Holder, Ink, Place, Run, RunField};
use leptos::prelude::*;
use std::collections::BTreeSet;

/// Characters from which a text is typed into a box of several lines.
const LONG_TEXT: usize = 200;

/// The id of the control of a place.
pub(super) fn control_id(place: Place) -> String {
    let field = file::field_name(place.field).replace('.', "-");
    match place.holder {
        Holder::Sheet => format!("field-{field}"),
        Holder::Feeder(id) | Holder::Source(id) => format!("field-{}-{field}", id.0),
    }
}

/// The figure which stands in for a field while nothing is entered there.
pub(super) const fn stand_in(place: Place) -> Option<Spot> {
    use FeederPart as F;
    let part = match place.field {
        Field::MotorCurrent => F::MotorCurrent,
        Field::DriveInput => F::DriveInput,
        Field::DriveLoss => F::DriveLoss,
        Field::DeviceRating => F::DeviceRating,
        Field::DeviceLoss => F::DeviceHeat,
        Field::ReactorLoss => F::ReactorHeat,
        Field::Run(Run::Ahead, RunField::Size) => F::Ahead(RunPart::Size),
        Field::Run(Run::Behind, RunField::Size) => F::Behind(RunPart::Size),
        Field::Run(Run::Incoming, RunField::Size) => {
            return Some(Spot::Panel(PanelPart::Incoming(RunPart::Size)));
        }
        Field::MainRating => return Some(Spot::Panel(PanelPart::MainRating)),
        Field::SourceFaultCurrent => return Some(Spot::Panel(PanelPart::AtSource)),
        _ => return None,
    };
    match place.holder {
        Holder::Feeder(id) => Some(Spot::Feeder(id, part)),
        Holder::Sheet | Holder::Source(_) => None,
    }
}

/// What is under the cursor at a place: the figure which stands in for it, or the field itself.
pub(super) fn spot_of(page: Page, place: Place) -> Spot {
    let is_entered = page.peek(|document| {
        let record = document.sheet.record(place.holder);
        record.is_some_and(|record| record.get(place.field).is_some())
            || document.drafts.contains_key(&place)
    });
    match stand_in(place) {
        Some(spot) if !is_entered => spot,
        _ => Spot::Field(place),
    }
}

/// What stands at a place, following its changes.
pub(super) fn shown(page: Page, place: Place, writing: Writing) -> Shown {
    page.worked.with(|worked| {
        let traced = stand_in(place).and_then(|spot| spot.traced(worked));
        let assumptions = match place.holder {
            Holder::Feeder(id) => super::spot::feeder(worked, id)
                .map_or(worked.assumptions.as_slice(), |feeder| &feeder.assumptions),
            Holder::Sheet | Holder::Source(_) => &worked.assumptions,
        };
        page.with(|document| {
            Holding {
                record: document.sheet.record(place.holder),
                drafts: &document.drafts,
                assumptions,
                system: page.system(),
            }
            .at(place, traced.as_ref(), writing)
        })
    })
}

/// A field with its label, its control and what is to be said about it.
pub(super) fn field(page: Page, place: Place) -> AnyView {
    named_field(page, place, words::label(place.field))
}

/// As [`field`], under another name.
pub(super) fn named_field(page: Page, place: Place, label: &'static str) -> AnyView {
    let id = control_id(place);
    let about = about_id(&id);
    let said = live(move || {
        let shown = shown(page, place, Writing::Bare);
        several(about_field(page, place, &shown))
    });
    tag("DIV")
        .class("field")
        .with(tag("LABEL").put("for", id).text(label))
        .with(
            tag("SPAN")
                .class("control")
                .child(control(page, place, label))
                .with(
                    tag("SPAN").class("unit").live_text(move || {
                        words::field_symbol(place.field, page.system()).to_owned()
                    }),
                ),
        )
        .with(tag("P").class("about").put("id", about).child(said))
        .done()
}

/// The control of a field alone, for a table whose heads name its columns.
pub(super) fn field_control(page: Page, place: Place) -> AnyView {
    let id = control_id(place);
    let about = about_id(&id);
    let label = words::label(place.field);
    let refused = live(move || match shown(page, place, Writing::Bare) {
        refused @ Shown::Refused(_) => several(about_field(page, place, &refused)),
        _ => several(Vec::new()),
    });
    several(vec![
        tag("LABEL")
            .class("unseen")
            .put("for", id)
            .text(label)
            .done(),
        control(page, place, label),
        tag("P")
            .class("about")
            .put("id", about)
            .child(refused)
            .done(),
    ])
}

fn about_id(id: &str) -> String {
    format!("{id}-about")
}

fn control(page: Page, place: Place, label: &'static str) -> AnyView {
    match spec(place.field).shape {
        Shape::Choice(offered) => choice(page, place, offered),
        Shape::Choices(offered) => choices(page, place, offered, label),
        Shape::Text { longest } if longest > LONG_TEXT => {
            typed(page, place, tag("TEXTAREA").set("rows", "2"))
        }
        shape => typed(
            page,
            place,
            tag("INPUT")
                .set("type", "text")
                .set("inputmode", keypad(shape)),
        ),
    }
}

/// The keys a screen keyboard offers for a shape.
pub(super) const fn keypad(shape: Shape) -> &'static str {
    match shape {
        Shape::Measured { .. } | Shape::Count { .. } => "decimal",
        _ => "text",
    }
}

/// What is to be said beside a control.
fn about_field(page: Page, place: Place, shown: &Shown) -> Vec<AnyView> {
    let system = page.system();
    let field = place.field;
    let inked = |ink: Ink, text: String| tag("SPAN").class(ink_class(ink)).say(text).done();
    match shown {
        Shown::Refused(text) => {
            let label = format!("{}: ", page::refused_label());
            let why = format!("{}{}", why_refused(field, text, system), still(page, place));
            vec![
                tag("STRONG").class("why").say(label).done(),
                markup::words(why),
            ]
        }
        Shown::Value(Ink::Assumed, text) => {
            let text = words::in_sentence(field, &with_symbol(field, text, system));
            let because = page::assumed_because(words::assumption_reason(field));
            vec![
                inked(Ink::Assumed, text),
                markup::words(format!(" {because}")),
            ]
        }
        Shown::Value(Ink::Worked, text) => vec![
            inked(Ink::Worked, with_symbol(field, text, system)),
            markup::words(format!(" {}", page::ink_key_worked())),
        ],
        Shown::Value(Ink::Entered, _) => {
            let typed = page.with(|document| typed_otherwise(document, place, system));
            typed
                .map(page::typed_as)
                .map(markup::words)
                .into_iter()
                .collect()
        }
        Shown::Nothing => accepted(field, system)
            .map(markup::words)
            .into_iter()
            .collect(),
    }
}

/// What still counts at a place where a text was refused.
fn still(page: Page, place: Place) -> String {
    let entered = page.with(|document| {
        let record = document.sheet.record(place.holder)?;
        let entered = record.get(place.field)?;
        Some(words::entry_with_unit(place.field, entered, page.system()))
    });
    entered.map_or_else(String::new, |entered| {
        format!(" {}", page::still_counts(&entered))
    })
}

/// What a measured field takes; other fields say it by themselves.
fn accepted(field: Field, system: UnitSystem) -> Option<String> {
    match spec(field).shape {
        Shape::Measured { .. } | Shape::Count { .. } | Shape::Size => {
            Some(page::accepts(&words::accepted(field, system)))
        }
        Shape::Text { .. } | Shape::Choice(_) | Shape::Choices(_) => None,
    }
}

/// Why the text kept beside a field was not taken.
pub(super) fn why_refused(field: Field, text: &str, system: UnitSystem) -> String {
    match entry::read(field, system, text) {
        Err(refusal) => words::entry_refusal(&refusal),
        // It was being typed when the page ended, or the units were changed since.
        Ok(_) => page::typed_not_taken().to_owned(),
    }
}

fn with_symbol(field: Field, text: &str, system: UnitSystem) -> String {
    match words::field_unit(field, system) {
        Some(unit) => words::with_unit(text, unit),
        None => text.to_owned(),
    }
}

/// The text by which a place opens for editing: what was refused, or what was entered.
pub(super) fn text_to_edit(page: Page, place: Place) -> String {
    let system = untrack(|| page.system());
    page.peek(|document| {
        if let Some(draft) = document.drafts.get(&place) {
            return draft.clone();
        }
        let record = document.sheet.record(place.holder);
        record
            .and_then(|record| record.get(place.field))
            .map_or_else(String::new, |entered| {
                words::entry_to_edit(place.field, entered, system)
            })
    })
}

/// The text as typed, where it was typed in another unit than the one shown.
fn typed_otherwise(
    document: &crate::sheet::Document,
    place: Place,
    system: UnitSystem,
) -> Option<String> {
    match document.sheet.record(place.holder)?.get(place.field)? {
        Entry::Measured(measured)
            if words::field_unit(place.field, system) != Some(measured.unit) =>
        {
            Some(measured.text.clone())
        }
        _ => None,
    }
}

/// Takes what a control holds, and shows it again as it was taken.
fn take(page: Page, place: Place, event: &Event) {
    let Some(text) = window::typed(event.target()) else {
        return;
    };
    page.enter(place, &text);
    let now = untrack(|| shown(page, place, Writing::Bare));
    window::set_typed(event.target(), now.typed());
}

/// Escape gives back the old text; where there is nothing to give back, it is left to the surrounding part.
fn give_back(page: Page, place: Place, event: &Event) {
    if window::key(event).is_none_or(|key| key.name != "Escape") {
        return;
    }
    let now = untrack(|| shown(page, place, Writing::Bare));
    if window::typed(event.target()).as_deref() != Some(now.typed()) {
        window::set_typed(event.target(), now.typed());
        page.keeping.forget_typing();
        event.stop_propagation();
    }
}

fn keep_typing(page: Page, place: Place, event: &Event) {
    if let Some(text) = window::typed(event.target()) {
        page.keeping.typing(place, &text);
    }
}

/// What stands in an empty control: the value which holds meanwhile.
fn placeholder(place: Place, shown: &Shown) -> String {
    match shown {
        Shown::Value(Ink::Assumed | Ink::Worked, text) => text.clone(),
        Shown::Nothing if matches!(spec(place.field).shape, Shape::Text { .. }) => String::new(),
        _ => page::choose_none().to_owned(),
    }
}

/// A control which is typed into.
fn typed(page: Page, place: Place, control: Markup) -> AnyView {
    let now = move || shown(page, place, Writing::Bare);
    common(page, place, control)
        .set("autocomplete", "off")
        .set("spellcheck", "false")
        .live("placeholder", move || Some(placeholder(place, &now())))
        .value(move || now().typed().to_owned())
        .on("input", move |event| keep_typing(page, place, &event))
        .on("change", move |event| take(page, place, &event))
        .on("keydown", move |event| give_back(page, place, &event))
        .done()
}

/// What all controls of a field have.
fn common(page: Page, place: Place, control: Markup) -> Markup {
    let id = control_id(place);
    let about = about_id(&id);
    control
        .put("id", id)
        .live("class", move || {
            Some(shown(page, place, Writing::Bare).class().to_owned())
        })
        .put("aria-describedby", about)
        .claim("aria-invalid", move || {
            matches!(shown(page, place, Writing::Bare), Shown::Refused(_))
        })
        .on("focus", move |_| page.spot.set(Some(spot_of(page, place))))
}

/// The entered answer of a field.
fn answer(page: Page, place: Place) -> Option<Choice> {
    page.with(|document| document.sheet.record(place.holder)?.choice(place.field))
}

/// The first option of a list: what holds while nothing is chosen.
pub(super) fn unchosen(shown: &Shown) -> String {
    match shown {
        Shown::Value(Ink::Assumed, text) => page::assumed_option(text),
        _ => page::choose_none().to_owned(),
    }
}

/// The edit by which a list's answer is taken; an empty text is its first option.
pub(super) fn choose(place: Place, offered: &'static [Choice], picked: &str) -> Edit {
    match offered
        .iter()
        .find(|answer| file::choice_name(**answer) == picked)
    {
        Some(answer) => Edit::Set(place, Entry::Choice(*answer)),
        None => Edit::Clear(place),
    }
}

/// The options of a list, with the entered answer picked.
pub(super) fn options(
    first: String,
    offered: &'static [Choice],
    picked: Option<Choice>,
) -> Vec<AnyView> {
    let option = |value: &'static str, text: String, is_picked: bool| {
        tag("OPTION")
            .set("value", value)
            .state("selected", move || is_picked)
            .say(text)
            .done()
    };
    let mut options = vec![option("", first, picked.is_none())];
    options.extend(offered.iter().map(|answer| {
        let name = file::choice_name(*answer);
        option(
            name,
            words::choice(*answer).to_owned(),
            picked == Some(*answer),
        )
    }));
    options
}

fn choice(page: Page, place: Place, offered: &'static [Choice]) -> AnyView {
    let list = live(move || {
        let first = unchosen(&shown(page, place, Writing::Bare));
        several(options(first, offered, answer(page, place)))
    });
    common(page, place, tag("SELECT"))
        .on("change", move |event| {
            if let Some(picked) = window::typed(event.target()) {
                page.edit(choose(place, offered, &picked));
            }
        })
        .child(list)
        .done()
}

fn choices(page: Page, place: Place, offered: &'static [Choice], label: &'static str) -> AnyView {
    let picked = move || -> BTreeSet<Choice> {
        page.with(|document| {
            let record = document.sheet.record(place.holder)?;
            record.choices(place.field).cloned()
        })
        .unwrap_or_default()
    };
    let toggle = move |answer: Choice| {
        let mut picked = untrack(picked);
        if !picked.remove(&answer) {
            picked.insert(answer);
        }
        page.edit(if picked.is_empty() {
            Edit::Clear(place)
        } else {
            Edit::Set(place, Entry::Choices(picked))
        });
    };
    let boxes = offered.iter().enumerate().map(|(position, answer)| {
        let answer = *answer;
        // The first box stands for them all where the field is gone to.
        let id = (position == 0).then(|| control_id(place));
        let control = tag("INPUT")
            .set("type", "checkbox")
            .maybe("id", id)
            .state("checked", move || picked().contains(&answer))
            .on("change", move |_| toggle(answer))
            .on("focus", move |_| page.spot.set(Some(spot_of(page, place))));
        tag("LABEL")
            .class("box")
            .with(control)
            .text(words::choice(answer))
            .done()
    });
    tag("SPAN")
        .class("boxes")
        .set("role", "group")
        .set("aria-label", label)
        .children(boxes)
        .done()
}

/// Whether a text was taken.
pub(super) fn is_taken(taken: &Taken) -> bool {
    matches!(taken, Taken::Taken)
}
