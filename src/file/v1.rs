//! Format 1: how a document is laid out in JSON.

use super::json::{Json, Members, excerpt};
use super::names::{
    choice_name, choice_named, field_name, field_named, size_name, size_named, unit_name,
    unit_named,
};
use super::{Damage, FORMAT, Fault, LARGEST_NEXT_ID, LONGEST_KIND, PROGRAM};
use crate::sheet::{
    Answers, Choice, Document, Drafts, Entry, Home, Impossible, Item, LONGEST_DRAFT, MOST_FEEDERS,
    MOST_SOURCES, Measured, NoteRef, Record, Shape, Sheet, home, spec,
};
use crate::working::{Field, Holder, HolderId, Place};
use serde_json::Value;
use std::collections::BTreeSet;
use std::sync::Arc;

/// Drafts, and answers, which a file may hold: more than the largest sheet has fields.
const MOST_REMARKS: usize = 100_000;

/// The text of `document`.
pub(super) fn write(document: &Document) -> String {
    let sheet = &document.sheet;
    let parts = [
        format!("\"format\": {FORMAT}"),
        format!("\"program\": {}", quoted(PROGRAM)),
        format!("\"next_id\": {}", sheet.next_id),
        format!("\"sheet\": {}", object(entry_lines(&sheet.record), "  ")),
        format!("\"feeders\": {}", items(&sheet.feeders)),
        format!("\"sources\": {}", items(&sheet.sources)),
        format!("\"drafts\": {}", list(draft_lines(&document.drafts), "  ")),
        format!(
            "\"answers\": {}",
            list(answer_lines(&document.answers), "  ")
        ),
    ];
    let mut text = object(parts.to_vec(), "");
    text.push('\n');
    text
}

fn items(items: &[Arc<Item>]) -> String {
    let objects = items.iter().map(|item| {
        let mut lines = vec![format!("\"id\": {}", item.id.0)];
        lines.extend(entry_lines(&item.record));
        object(lines, "    ")
    });
    list(objects.collect(), "  ")
}

fn entry_lines(record: &Record) -> Vec<String> {
    let line = |(field, entry)| format!("{}: {}", quoted(&field_name(field)), written(entry));
    record.iter().map(line).collect()
}

fn written(entry: &Entry) -> String {
    match entry {
        Entry::Text(text) => format!("{{\"text\": {}}}", quoted(text)),
        Entry::Measured(measured) => format!(
            "{{\"number\": {}, \"unit\": {}, \"text\": {}}}",
            Value::from(measured.number),
            quoted(unit_name(measured.unit)),
            quoted(&measured.text)
        ),
        Entry::Count(count) => format!("{{\"count\": {count}}}"),
        Entry::Choice(choice) => format!("{{\"choice\": {}}}", quoted(choice_name(*choice))),
        Entry::Choices(choices) => {
            let names: Vec<_> = choices
                .iter()
                .map(|choice| quoted(choice_name(*choice)))
                .collect();
            format!("{{\"choices\": [{}]}}", names.join(", "))
        }
        Entry::Size(size) => format!("{{\"size\": {}}}", quoted(size_name(*size))),
    }
}

fn draft_lines(drafts: &Drafts) -> Vec<String> {
    let line = |(place, text): (&Place, &String)| {
        format!("{{{}, \"text\": {}}}", place_written(*place), quoted(text))
    };
    drafts.iter().map(line).collect()
}

fn answer_lines(answers: &Answers) -> Vec<String> {
    let line = |(note, text): (&NoteRef, &String)| {
        format!(
            "{{{}, \"kind\": {}, \"text\": {}}}",
            place_written(note.place),
            quoted(&note.kind),
            quoted(text)
        )
    };
    answers.iter().map(line).collect()
}

fn place_written(place: Place) -> String {
    let field = format!("\"field\": {}", quoted(&field_name(place.field)));
    match place.holder {
        Holder::Sheet => field,
        Holder::Feeder(HolderId(id)) => format!("\"feeder\": {id}, {field}"),
        Holder::Source(HolderId(id)) => format!("\"source\": {id}, {field}"),
    }
}

fn object(lines: Vec<String>, indent: &str) -> String {
    bracketed('{', lines, '}', indent)
}

fn list(lines: Vec<String>, indent: &str) -> String {
    bracketed('[', lines, ']', indent)
}

fn bracketed(open: char, lines: Vec<String>, close: char, indent: &str) -> String {
    if lines.is_empty() {
        return format!("{open}{close}");
    }
    let joint = format!(",\n{indent}  ");
    format!("{open}\n{indent}  {}\n{indent}{close}", lines.join(&joint))
}

fn quoted(text: &str) -> String {
    Value::from(text).to_string()
}

/// The document in the tree of a file of this format.
pub(super) fn read(json: Json) -> Result<Document, Damage> {
    let mut members = json.members()?;
    members.take("format", Ok)?;
    members.take("program", Ok)?;
    let next_id = members.take("next_id", read_next_id)?;
    let record = members.take("sheet", |json| read_record(json.members()?, Home::Sheet))?;
    let feeders = members.take("feeders", |json| {
        json.items(MOST_FEEDERS, |json| read_item(json, Home::Feeder))
    })?;
    let sources = members.take("sources", |json| {
        json.items(MOST_SOURCES, |json| read_item(json, Home::Source))
    })?;
    let sheet = Sheet {
        record,
        feeders,
        sources,
        next_id,
    };
    check_ids(&sheet)?;
    let drafts = members.take("drafts", |json| read_drafts(json, &sheet))?;
    let answers = members.take("answers", |json| read_answers(json, &sheet))?;
    members.end()?;
    Ok(Document {
        sheet,
        drafts,
        answers,
    })
}

fn read_next_id(json: Json) -> Result<u32, Damage> {
    let next = json.whole()?;
    if next > LARGEST_NEXT_ID {
        return Err(Damage::here(Fault::TooLargeNumber {
            most: LARGEST_NEXT_ID,
        }));
    }
    Ok(next)
}

fn read_item(json: Json, of: Home) -> Result<Arc<Item>, Damage> {
    let mut members = json.members()?;
    let id = HolderId(members.take("id", Json::whole)?);
    let record = read_record(members, of)?;
    Ok(Arc::new(Item { id, record }))
}

fn read_record(members: Members, of: Home) -> Result<Record, Damage> {
    let mut record = Record::default();
    for (name, json) in members.rest() {
        read_field(&mut record, &name, json, of).map_err(|damage| damage.within(&name))?;
    }
    Ok(record)
}

fn read_field(record: &mut Record, name: &str, json: Json, of: Home) -> Result<(), Damage> {
    let field = known_field(name)?;
    if home(field) != of {
        return Err(Damage::here(Fault::WrongHolder));
    }
    let entry = read_entry(field, json.members()?)?;
    record
        .set(field, entry)
        .map_err(|why| Damage::here(Fault::Impossible(why)))
}

fn known_field(name: &str) -> Result<Field, Damage> {
    field_named(name).ok_or_else(|| Damage::here(Fault::UnknownName))
}

fn read_entry(field: Field, mut members: Members) -> Result<Entry, Damage> {
    let entry = match spec(field).shape {
        Shape::Text { .. } => Entry::Text(members.take("text", Json::text)?),
        Shape::Measured { kind, .. } => Entry::Measured(Measured {
            number: members.take("number", Json::number)?,
            unit: members.take("unit", |json| {
                let found = json.text()?;
                match unit_named(&found) {
                    None => Err(Damage::here(Fault::UnknownUnit {
                        found: excerpt(&found),
                    })),
                    Some(unit) if !unit.measures(kind) => Err(Damage::here(Fault::WrongUnit {
                        found: excerpt(&found),
                    })),
                    Some(unit) => Ok(unit),
                }
            })?,
            text: members.take("text", Json::text)?,
        }),
        Shape::Count { .. } => Entry::Count(members.take("count", Json::whole)?),
        Shape::Choice(_) => Entry::Choice(members.take("choice", read_choice)?),
        Shape::Choices(offered) => Entry::Choices(members.take("choices", |json| {
            distinct(json.items(offered.len(), read_choice)?)
        })?),
        Shape::Size => Entry::Size(members.take("size", |json| {
            let found = json.text()?;
            size_named(&found).ok_or_else(|| {
                Damage::here(Fault::UnknownSize {
                    found: excerpt(&found),
                })
            })
        })?),
    };
    members.end()?;
    Ok(entry)
}

fn read_choice(json: Json) -> Result<Choice, Damage> {
    let found = json.text()?;
    choice_named(&found).ok_or_else(|| {
        Damage::here(Fault::UnknownChoice {
            found: excerpt(&found),
        })
    })
}

fn distinct(choices: Vec<Choice>) -> Result<BTreeSet<Choice>, Damage> {
    let many = choices.len();
    let set = BTreeSet::from_iter(choices);
    if set.len() < many {
        return Err(Damage::here(Fault::Repeated));
    }
    Ok(set)
}

/// Each identity stands once, and none will be given out again.
fn check_ids(sheet: &Sheet) -> Result<(), Damage> {
    let mut seen = BTreeSet::new();
    for (list, items) in [("feeders", &sheet.feeders), ("sources", &sheet.sources)] {
        for (position, item) in items.iter().enumerate() {
            let HolderId(id) = item.id;
            let fault = if id >= sheet.next_id {
                Fault::IdNotGivenOut {
                    id,
                    next: sheet.next_id,
                }
            } else if seen.insert(id) {
                continue;
            } else {
                Fault::IdTwice { id }
            };
            return Err(Damage::here(fault).within(&format!("{list}[{position}].id")));
        }
    }
    Ok(())
}

fn read_drafts(json: Json, sheet: &Sheet) -> Result<Drafts, Damage> {
    let mut drafts = Drafts::new();
    json.items(MOST_REMARKS, |json| {
        let mut members = json.members()?;
        let place = read_place(&mut members, sheet)?;
        let text = members.take("text", |json| bounded(json, LONGEST_DRAFT))?;
        members.end()?;
        if !sheet.has(place) {
            return Err(Damage::here(Fault::WrongHolder).within("field"));
        }
        match drafts.insert(place, text) {
            None => Ok(()),
            Some(_) => Err(Damage::here(Fault::Repeated)),
        }
    })?;
    Ok(drafts)
}

/// A note may stand at any field of any holder, so the field is not compared with the holder here.
fn read_answers(json: Json, sheet: &Sheet) -> Result<Answers, Damage> {
    let mut answers = Answers::new();
    json.items(MOST_REMARKS, |json| {
        let mut members = json.members()?;
        let place = read_place(&mut members, sheet)?;
        // Kinds are not compared with those known: a later version may have more, and an answer is never dropped.
        let kind = members.take("kind", |json| filled(bounded(json, LONGEST_KIND)?))?;
        let text = members.take("text", |json| filled(bounded(json, LONGEST_DRAFT)?))?;
        members.end()?;
        match answers.insert(NoteRef { place, kind }, text) {
            None => Ok(()),
            Some(_) => Err(Damage::here(Fault::Repeated)),
        }
    })?;
    Ok(answers)
}

fn read_place(members: &mut Members, sheet: &Sheet) -> Result<Place, Damage> {
    let feeder = members.take_if_there("feeder", Json::whole)?;
    let source = members.take_if_there("source", Json::whole)?;
    let (holder, name) = match (feeder, source) {
        (None, None) => (Holder::Sheet, ""),
        (Some(id), None) => (Holder::Feeder(HolderId(id)), "feeder"),
        (None, Some(id)) => (Holder::Source(HolderId(id)), "source"),
        (Some(_), Some(_)) => return Err(Damage::here(Fault::TwoHolders)),
    };
    if let (None, Some(id)) = (sheet.record(holder), feeder.or(source)) {
        return Err(Damage::here(Fault::NoSuchHolder { id }).within(name));
    }
    let field = members.take("field", |json| known_field(&json.text()?))?;
    Ok(Place { holder, field })
}

fn bounded(json: Json, most: usize) -> Result<String, Damage> {
    let text = json.text()?;
    if text.chars().count() > most {
        return Err(Damage::here(Fault::TooLong { most }));
    }
    Ok(text)
}

fn filled(text: String) -> Result<String, Damage> {
    if text.is_empty() {
        return Err(Damage::here(Fault::Impossible(Impossible::Empty)));
    }
    Ok(text)
}
