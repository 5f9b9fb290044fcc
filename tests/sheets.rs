//! Whole example sheets: they open, write back to the byte, work out, and show what they showed before.
//!
//! The data of the example sheets are invented: nothing here compares them with the outside world, and no value of
//! theirs is an expected value anywhere. The texts in `sheets/*.snap` are former output: no ground for truth, only a
//! means to see in review which shown numbers a change moves.

#![allow(
    clippy::expect_used,
    clippy::indexing_slicing,
    reason = "helpers of tests stop at the first surprise"
)]

#[path = "../examples/summary_json/mod.rs"]
mod summary_json;
#[path = "common/worked_figures.rs"]
mod worked_figures;

use serde_json::Value;
use std::collections::BTreeSet;
use std::fs;
use ventrail::sheet::{Document, UnitSystem};
use ventrail::sizing::rules;
use ventrail::work::work_out;
use ventrail::working::{Amount, Grade};
use ventrail::{file, words};
use worked_figures::every_figure;

/// The example sheets, by the name of their file.
const SHEETS: [&str; 2] = ["brine-hall", "high-sealed"];

fn text_of(name: &str) -> String {
    let path = format!("{}/examples/{name}.json", env!("CARGO_MANIFEST_DIR"));
    fs::read_to_string(&path).unwrap_or_else(|error| panic!("{path}: {error}"))
}

fn document_of(name: &str) -> Document {
    file::read(&text_of(name)).unwrap_or_else(|refusal| panic!("{name}: {refusal:?}"))
}

#[test]
fn every_example_writes_back_to_the_byte() {
    for name in SHEETS {
        let text = text_of(name);
        let document = file::read(&text).unwrap_or_else(|refusal| panic!("{name}: {refusal:?}"));
        assert_eq!(file::write(&document), text, "{name}");
    }
}

#[test]
fn every_example_works_out_in_finite_numbers() {
    for name in SHEETS {
        let worked = work_out(&document_of(name).sheet);
        let figures = every_figure(&worked);
        assert!(figures.len() > 100, "{name}: {} figures", figures.len());
        for figure in figures {
            check_finite(name, figure.rule.id, figure.value);
            for term in &figure.terms {
                check_finite(name, figure.rule.id, term.amount);
            }
        }
    }
}

#[test]
fn every_answer_of_an_example_answers_a_note() {
    for name in SHEETS {
        let document = document_of(name);
        let worked = work_out(&document.sheet);
        assert!(!document.answers.is_empty(), "{name}");
        for answered in document.answers.keys() {
            let stands = worked
                .notes
                .iter()
                .any(|note| note.place == answered.place && note.kind.id() == answered.kind);
            assert!(
                stands,
                "{name}: nothing asks for the answer to {answered:?}"
            );
        }
    }
}

#[test]
fn an_example_has_one_stop_at_most() {
    for name in SHEETS {
        let worked = work_out(&document_of(name).sheet);
        let stops: Vec<_> = worked
            .notes
            .iter()
            .filter(|note| note.grade == Grade::Stop)
            .map(|note| note.kind.id())
            .collect();
        assert!(stops.len() <= 1, "{name}: {stops:?}");
    }
}

#[test]
fn every_example_shows_what_it_showed() {
    for name in SHEETS {
        let document = document_of(name);
        let shown = whole(&summary_of(&document));
        let mut workings: Vec<String> = every_figure(&work_out(&document.sheet))
            .iter()
            .map(|figure| words::working_flat(figure, system_of(name)))
            .collect();
        workings.sort();
        workings.dedup();
        insta::with_settings!({ snapshot_path => "sheets", prepend_module_to_snapshot => false, omit_expression => true }, {
            insta::assert_snapshot!(name, shown);
            insta::assert_snapshot!(format!("{name}-workings"), workings.join("\n"));
        });
    }
}

fn system_of(name: &str) -> UnitSystem {
    match name {
        "high-sealed" => UnitSystem::Si,
        _ => UnitSystem::Us,
    }
}

fn summary_of(document: &Document) -> Value {
    let mut text = Vec::new();
    summary_json::write_summary(document, &mut text).expect("a summary is written");
    serde_json::from_slice(&text).expect("a summary is JSON")
}

/// The parts of the summary in the order of the page.
const PARTS: [&str; 12] = [
    "sheet",
    "totals",
    "notes",
    "incoming",
    "fault",
    "lowest_rating",
    "feeders",
    "sources",
    "ledger",
    "enclosure",
    "assumptions",
    "drafts",
];

/// The summary as indented lines of names and shown values, without workings. The cautions are fixed texts: left out.
fn whole(summary: &Value) -> String {
    let members = summary.as_object().into_iter().flatten();
    let unlisted: Vec<_> = members
        .map(|(name, _)| name.as_str())
        .filter(|name| !PARTS.contains(name) && !["layout", "program", "cautions"].contains(name))
        .collect();
    assert!(unlisted.is_empty(), "not shown: {unlisted:?}");
    let mut text = String::new();
    for part in PARTS {
        if let Some(value) = summary.get(part) {
            push_member(&mut text, part, value, 0);
        }
    }
    text
}

/// The members by which items of lists are known: they stand in the titles.
const TITLES: [&str; 6] = ["tag", "name", "group", "kind", "grade", "place"];

fn push_member(text: &mut String, name: &str, value: &Value, depth: usize) {
    if value.as_array().is_some_and(Vec::is_empty) {
        return;
    }
    let indent = "  ".repeat(depth);
    if let Some(line) = in_one_line(value) {
        text.push_str(&format!("{indent}{name}: {line}\n"));
        return;
    }
    text.push_str(&format!("{indent}{name}:\n"));
    match value {
        Value::Object(members) => {
            for (name, value) in members {
                push_member(text, name, value, depth + 1);
            }
        }
        Value::Array(items) => {
            for (position, item) in items.iter().enumerate() {
                let name = title_of(item).unwrap_or_else(|| format!("{}", position + 1));
                push_member(text, &name, &untitled(item), depth + 1);
            }
        }
        other => panic!("{other} fits no line"),
    }
}

/// The item without what its title says.
fn untitled(item: &Value) -> Value {
    let mut item = item.clone();
    if let Value::Object(members) = &mut item
        && !members.contains_key("shown")
    {
        members.retain(|name, _| !TITLES.contains(&name.as_str()));
    }
    item
}

/// By what an item of a list is known.
fn title_of(item: &Value) -> Option<String> {
    let place = item.get("place").map(place_of);
    let part = |name: &str| item.get(name).and_then(Value::as_str).map(str::to_owned);
    let named = ["tag", "name", "group", "kind"].into_iter().find_map(part);
    match (part("grade"), named, place) {
        (Some(grade), Some(kind), Some(place)) => Some(format!("{grade}, {kind} at {place}")),
        (_, named, place) => named.or(place),
    }
}

fn place_of(place: &Value) -> String {
    let part = |name: &str| place.get(name).and_then(Value::as_str).unwrap_or_default();
    match place.get("tag") {
        Some(_) => format!("{}, {}", part("tag"), part("field")),
        None => part("field").to_owned(),
    }
}

fn in_one_line(value: &Value) -> Option<String> {
    match value {
        Value::Object(members) if members.contains_key("shown") => {
            let part = |name: &str| members.get(name).and_then(Value::as_str);
            let ink = part("ink").map_or(String::new(), |ink| format!(" ({ink})"));
            Some(format!("{}{ink}", part("shown").unwrap_or_default()))
        }
        Value::Object(members) if members.contains_key("field") => Some(place_of(value)),
        Value::Object(_) => None,
        Value::Array(items) => {
            let lines: Option<Vec<_>> = items.iter().map(in_one_line).collect();
            let is_short = items.iter().all(|item| item.get("place").is_none());
            lines.filter(|_| is_short).map(|lines| lines.join("; "))
        }
        Value::String(text) => Some(text.clone()),
        other => Some(other.to_string()),
    }
}

#[test]
fn the_summary_holds_every_figure_with_its_working() {
    let known: BTreeSet<&str> = rules::all().iter().map(|rule| rule.id).collect();
    for name in SHEETS {
        let document = document_of(name);
        let worked: BTreeSet<String> = every_figure(&work_out(&document.sheet))
            .iter()
            .map(|figure| figure.rule.id.to_owned())
            .collect();
        let mut cited = BTreeSet::new();
        check_values(&summary_of(&document), &mut cited);
        assert_eq!(cited, worked, "{name}");
        assert!(cited.iter().all(|id| known.contains(id.as_str())), "{name}");
    }
}

/// Every value has a number or name, every number but a count its unit, every worked value its rule, source and terms.
fn check_values(json: &Value, cited: &mut BTreeSet<String>) {
    match json {
        Value::Object(members) => {
            if let Some(value) = members.get("value") {
                let is_whole = value.is_u64();
                let is_number = value.is_f64();
                assert!(is_whole || is_number || value.is_string(), "{json}");
                assert_eq!(members.contains_key("unit"), is_number, "{json}");
            }
            if members.get("ink").and_then(Value::as_str) == Some("worked") {
                let working = members.get("working").unwrap_or_else(|| panic!("{json}"));
                for part in ["rule", "form", "source", "clause", "known", "terms"] {
                    assert!(working.get(part).is_some(), "{part} is missing in {json}");
                }
            }
            if let Some(rule) = members.get("rule").and_then(Value::as_str) {
                cited.insert(rule.to_owned());
            }
            members
                .values()
                .for_each(|member| check_values(member, cited));
        }
        Value::Array(items) => items.iter().for_each(|item| check_values(item, cited)),
        _ => {}
    }
}

#[test]
fn the_summary_says_how_notes_were_answered() {
    let summary = summary_of(&document_of("brine-hall"));
    let notes = summary["notes"].as_array().expect("notes are a list");
    let answered: Vec<_> = notes
        .iter()
        .filter(|note| note.get("answer").is_some())
        .collect();
    assert_eq!(answered.len(), document_of("brine-hall").answers.len());
    let grades: Vec<_> = notes
        .iter()
        .filter_map(|note| note["grade"].as_str())
        .collect();
    let rank = |grade: &&str| {
        ["stop", "query", "note"]
            .iter()
            .position(|known| known == grade)
    };
    assert!(grades.is_sorted_by_key(rank), "{grades:?}");
}

#[track_caller]
fn check_finite(name: &str, rule: &str, amount: Amount) {
    if let Amount::Measured { si, .. } = amount {
        assert!(si.is_finite(), "{name}: {rule} gives {si}");
    }
}

#[test]
fn every_member_of_the_summary_is_described() {
    let guide = include_str!("../DEVELOPERS.md");
    let mut names = BTreeSet::new();
    for name in SHEETS {
        gather_names(&summary_of(&document_of(name)), &mut names);
    }
    assert!(names.len() > 100, "{names:?}");
    for name in names {
        assert!(
            guide.contains(&format!("`{name}`")),
            "{name} is not described"
        );
    }
}

fn gather_names(json: &Value, names: &mut BTreeSet<String>) {
    match json {
        Value::Object(members) => {
            names.extend(members.keys().cloned());
            members
                .values()
                .for_each(|member| gather_names(member, names));
        }
        Value::Array(items) => items.iter().for_each(|item| gather_names(item, names)),
        _ => {}
    }
}
