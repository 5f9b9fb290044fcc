//! Every format ever shipped still opens, what is written comes back to the byte, and damage is refused by its place.

#![allow(
    clippy::expect_used,
    clippy::unwrap_used,
    clippy::indexing_slicing,
    reason = "helpers of tests stop at the first surprise"
)]

#[path = "common/random_sheets.rs"]
mod random_sheets;

use proptest::prelude::*;
use random_sheets::any_document;
use std::collections::BTreeSet;
use std::fs;
use std::path::{Path, PathBuf};
use std::sync::Arc;
use ventrail::file::{self, Damage, Expected, FORMAT, Fault, Refusal, read, write};
use ventrail::quantity::{Kind, Unit, WireSize};
use ventrail::sheet::{
    Document, Edit, Entry, Home, Impossible, Item, LONGEST_DRAFT, MOST_FEEDERS, Measured, NoteRef,
    Record, Shape, Sheet, fields_of, spec,
};
use ventrail::working::{Field, Holder, HolderId, Place, Run, RunField};

const ORDINARY: &str = include_str!("saved/v1/ordinary.json");

#[test]
fn every_shipped_file_opens() {
    for format in 1..=FORMAT {
        for (path, text) in saved(format) {
            if let Err(refusal) = read(&text) {
                panic!("{} is refused: {refusal:?}", path.display());
            }
        }
    }
}

#[test]
fn a_file_of_the_newest_format_is_the_same_to_the_byte_when_written_again() {
    for (path, text) in saved(FORMAT) {
        let document = read(&text).expect("a shipped file opens");
        assert!(
            write(&document) == text,
            "{} changes when it is written again",
            path.display()
        );
    }
}

/// A field, choice, unit or size which no kept file has could be renamed unseen.
#[test]
fn the_kept_files_of_the_newest_format_hold_every_name() {
    let mut kept = BTreeSet::new();
    for (_, text) in saved(FORMAT) {
        // Whether it opens is asked above.
        if let Ok(document) = read(&text) {
            kept.extend(names_in(&document));
        }
    }
    let mut wanted = BTreeSet::new();
    for home in [Home::Sheet, Home::Feeder, Home::Source] {
        wanted.extend(fields_of(home).into_iter().flat_map(names_of));
    }
    let missing: Vec<_> = wanted.difference(&kept).collect();
    if !missing.is_empty() {
        let folder = Path::new(env!("CARGO_TARGET_TMPDIR"));
        for turn in 0..FULL_SHEETS {
            fs::write(
                folder.join(format!("full_{turn}.json")),
                write(&full_document(turn)),
            )
            .unwrap();
        }
        panic!(
            "no kept file has {missing:?}. A format once shipped does not get new names: raise file::FORMAT first. \
             Files which hold every name were written to {}; put them into tests/saved/v{FORMAT}",
            folder.display()
        );
    }
}

#[test]
fn the_ordinary_file_says_what_was_entered() {
    let document = read(ORDINARY).unwrap();
    let sheet = &document.sheet;
    let supply = sheet.record.get(Field::SupplyVoltage).unwrap();
    let expected = Measured {
        number: 480.0,
        unit: Unit::Volt,
        text: "480".to_owned(),
    };
    assert_eq!(*supply, Entry::Measured(expected));
    assert_eq!(
        sheet.record.text(Field::SheetName),
        "Wash bay \"north\", panel 2"
    );
    let ids: Vec<u32> = sheet.feeders.iter().map(|item| item.id.0).collect();
    assert_eq!(ids, [2, 0, 5]);
    let draft = Place {
        holder: Holder::Feeder(HolderId(5)),
        field: Field::MotorPower,
    };
    assert_eq!(document.drafts[&draft], "1,234.5");
    assert_eq!(document.answers.len(), 1);
}

#[test]
fn one_entry_changed_changes_one_line() {
    let before = read(ORDINARY).unwrap();
    let place = Place {
        holder: Holder::Feeder(HolderId(0)),
        field: Field::Tag,
    };
    let after = before.after(&Edit::Set(place, Entry::Text("F-116".to_owned())));
    let (before, after) = (write(&before), write(&after));
    let differing = before
        .lines()
        .zip(after.lines())
        .filter(|(a, b)| a != b)
        .count();
    assert_eq!(before.lines().count(), after.lines().count());
    assert_eq!(differing, 1);
}

#[test]
fn the_format_number_stands_first() {
    assert!(write(&Document::default()).starts_with(&format!("{{\n  \"format\": {FORMAT},\n")));
}

#[test]
fn an_empty_document_comes_back() {
    let document = Document::default();
    assert_eq!(read(&write(&document)), Ok(document));
}

#[test]
fn names_may_stand_in_any_order() {
    let shuffled = r#"{"answers":[],"drafts":[],"sources":[],"feeders":[{"tag":{"text":"P-1"},"id":0}],
        "sheet":{"altitude":{"text":"1900 m","unit":"m","number":1900}},"next_id":1,"program":"ventrail","format":1}"#;
    let document = read(shuffled).unwrap();
    assert_eq!(document.sheet.feeders[0].record.text(Field::Tag), "P-1");
}

#[test]
fn each_kind_of_damage_is_refused_with_its_place() {
    let wrong = |expected| Fault::WrongType { expected };
    let found = |name: &str| name.to_owned();
    let out_of_range = |least, most| Fault::Impossible(Impossible::OutOfRange { least, most });
    let rows = [
        // What stands in the file, what stands there instead, where it is refused, and why.
        (r#""next_id": 9,"#, "", "next_id", Fault::Missing),
        (
            r#""next_id": 9"#,
            r#""next_id": 9.0"#,
            "next_id",
            wrong(Expected::WholeNumber),
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": -9"#,
            "next_id",
            wrong(Expected::WholeNumber),
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": null"#,
            "next_id",
            wrong(Expected::WholeNumber),
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": 4294967295"#,
            "next_id",
            Fault::TooLargeNumber {
                most: file::LARGEST_NEXT_ID,
            },
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": 4294967296"#,
            "next_id",
            Fault::TooLargeNumber { most: u32::MAX },
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": 9, "next_id": 9"#,
            "next_id",
            Fault::Repeated,
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": 9, "note": 1"#,
            "note",
            Fault::UnknownName,
        ),
        (
            r#""next_id": 9"#,
            r#""next_id": 8"#,
            "sources[0].id",
            Fault::IdNotGivenOut { id: 8, next: 8 },
        ),
        (
            r#""id": 0"#,
            r#""id": 2"#,
            "feeders[1].id",
            Fault::IdTwice { id: 2 },
        ),
        (
            r#""id": 8"#,
            r#""id": 2"#,
            "sources[0].id",
            Fault::IdTwice { id: 2 },
        ),
        (
            r#""id": 5"#,
            r#""tag": {"text": "x"}"#,
            "feeders[2].id",
            Fault::Missing,
        ),
        (
            r#""id": 5"#,
            r#""id": "5""#,
            "feeders[2].id",
            wrong(Expected::WholeNumber),
        ),
        (
            r#""sources": ["#,
            r#""sources": [7, "#,
            "sources[0]",
            wrong(Expected::Object),
        ),
        (
            r#""job": {"text": "J-0417"}"#,
            r#""job": "J-0417""#,
            "sheet.job",
            wrong(Expected::Object),
        ),
        (
            r#""J-0417""#,
            "417",
            "sheet.job.text",
            wrong(Expected::Text),
        ),
        (
            r#""J-0417""#,
            r#""""#,
            "sheet.job",
            Fault::Impossible(Impossible::Empty),
        ),
        (
            r#""J-0417""#,
            r#""0123456789012345678901234567890123456789012345678901234567890""#,
            "sheet.job",
            Fault::Impossible(Impossible::TooLong { most: 60 }),
        ),
        (r#""job""#, r#""jobs""#, "sheet.jobs", Fault::UnknownName),
        (r#""job""#, r#""tag""#, "sheet.tag", Fault::WrongHolder),
        (
            r#""job""#,
            r#""incoming""#,
            "sheet.incoming",
            Fault::UnknownName,
        ),
        (
            r#""job""#,
            r#""incoming.colour""#,
            "sheet.incoming.colour",
            Fault::UnknownName,
        ),
        (
            r#""job""#,
            r#""sheet_name""#,
            "sheet.sheet_name",
            Fault::Repeated,
        ),
        (
            r#""ahead.size""#,
            r#""incoming.size""#,
            "feeders[1].incoming.size",
            Fault::WrongHolder,
        ),
        (
            r#""source_name""#,
            r#""load""#,
            "sources[0].load",
            Fault::WrongHolder,
        ),
        (
            r#""unit": "MVA""#,
            r#""unit": "kW""#,
            "sheet.transformer_power.unit",
            Fault::WrongUnit { found: found("kW") },
        ),
        (
            r#""unit": "MVA""#,
            r#""unit": "mva""#,
            "sheet.transformer_power.unit",
            Fault::UnknownUnit {
                found: found("mva"),
            },
        ),
        (
            r#""unit": "MVA", "#,
            "",
            "sheet.transformer_power.unit",
            Fault::Missing,
        ),
        (
            r#""number": 1.5, "#,
            r#""number": "1.5", "#,
            "sheet.transformer_power.number",
            wrong(Expected::Number),
        ),
        (
            r#""number": 1.5, "#,
            r#""number": null, "#,
            "sheet.transformer_power.number",
            wrong(Expected::Number),
        ),
        (
            r#""number": 1.5, "#,
            r#""number": 1500, "#,
            "sheet.transformer_power",
            out_of_range(1e3, 1e8),
        ),
        (
            r#""number": 1.5, "#,
            r#""number": 1e308, "#,
            "sheet.transformer_power",
            Fault::Impossible(Impossible::NotFinite),
        ),
        (
            r#""text": "1,5 MVA""#,
            r#""text": """#,
            "sheet.transformer_power",
            Fault::Impossible(Impossible::Empty),
        ),
        (
            r#""text": "1,5 MVA""#,
            r#""txt": "1,5 MVA""#,
            "sheet.transformer_power.text",
            Fault::Missing,
        ),
        (
            r#""text": "1,5 MVA""#,
            r#""text": "1,5 MVA", "by": "x""#,
            "sheet.transformer_power.by",
            Fault::UnknownName,
        ),
        (
            r#""text": "1,5 MVA""#,
            r#""text": "1,5 MVA", "unit": "VA""#,
            "sheet.transformer_power.unit",
            Fault::Repeated,
        ),
        (
            r#""count": 2"#,
            r#""count": 2.5"#,
            "sheet.incoming.sets.count",
            wrong(Expected::WholeNumber),
        ),
        (
            r#""count": 2"#,
            r#""count": 13"#,
            "sheet.incoming.sets",
            out_of_range(1.0, 12.0),
        ),
        (
            r#""choice": "standby""#,
            r#""choice": "idle""#,
            "feeders[1].running.choice",
            Fault::UnknownChoice {
                found: found("idle"),
            },
        ),
        (
            r#""choice": "standby""#,
            r#""choice": "copper""#,
            "feeders[1].running",
            Fault::Impossible(Impossible::NotOffered),
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            "[]",
            "feeders[0].permitted_types",
            Fault::Impossible(Impossible::Empty),
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            r#"["class_cc_fuse", "class_cc_fuse"]"#,
            "feeders[0].permitted_types.choices",
            Fault::Repeated,
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            r#"["class_cc_fuse", "copper"]"#,
            "feeders[0].permitted_types",
            Fault::Impossible(Impossible::NotOffered),
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            r#"["class_cc_fuse", "class_cc_fuse", "class_cc_fuse", "class_cc_fuse", "class_cc_fuse"]"#,
            "feeders[0].permitted_types.choices",
            Fault::TooMany { most: 4 },
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            r#"["class_cc_fuse", 3]"#,
            "feeders[0].permitted_types.choices[1]",
            wrong(Expected::Text),
        ),
        (
            r#"["class_cc_fuse", "inverse_time_breaker"]"#,
            r#""class_cc_fuse""#,
            "feeders[0].permitted_types.choices",
            wrong(Expected::List),
        ),
        (
            r#""size": "10""#,
            r#""size": "11""#,
            "feeders[0].behind.size.size",
            Fault::UnknownSize { found: found("11") },
        ),
        (
            r#""size": "10""#,
            r#""size": 10"#,
            "feeders[0].behind.size.size",
            wrong(Expected::Text),
        ),
        (
            r#""feeder": 5"#,
            r#""feeder": 6"#,
            "drafts[1].feeder",
            Fault::NoSuchHolder { id: 6 },
        ),
        (
            r#""feeder": 5"#,
            r#""source": 5"#,
            "drafts[1].source",
            Fault::NoSuchHolder { id: 5 },
        ),
        (
            r#""feeder": 5"#,
            r#""feeder": 5, "source": 8"#,
            "drafts[1]",
            Fault::TwoHolders,
        ),
        (
            r#""feeder": 5, "#,
            "",
            "drafts[1].field",
            Fault::WrongHolder,
        ),
        (
            r#""field": "motor_power""#,
            r#""field": "motor_pwr""#,
            "drafts[1].field",
            Fault::UnknownName,
        ),
        (
            r#""field": "motor_power", "#,
            "",
            "drafts[1].field",
            Fault::Missing,
        ),
        (
            r#"{"field": "altitude", "text": "quite high"},"#,
            r#"{"feeder": 5, "field": "motor_power", "text": "?"},"#,
            "drafts[1]",
            Fault::Repeated,
        ),
        (
            r#""kind": "drive-input-assumed""#,
            r#""kind": """#,
            "answers[0].kind",
            Fault::Impossible(Impossible::Empty),
        ),
        (
            r#""kind": "drive-input-assumed""#,
            r#""kind": "drive-input-assumed-drive-input-assumed-drive-input-assumed-drive""#,
            "answers[0].kind",
            Fault::TooLong {
                most: file::LONGEST_KIND,
            },
        ),
        (
            r#""Drive not yet ordered; figure to be replaced.""#,
            r#""""#,
            "answers[0].text",
            Fault::Impossible(Impossible::Empty),
        ),
    ];
    let mut failures = Vec::new();
    for (old, new, path, fault) in rows {
        let expected = Err(damaged(path, fault));
        let got = read(&replaced(old, new));
        if got != expected {
            failures.push(format!(
                "{old} -> {new}\n  expected {expected:?}\n  got      {got:?}"
            ));
        }
    }
    assert!(failures.is_empty(), "{}", failures.join("\n"));
}

#[test]
fn what_is_no_sheet_is_told_from_a_damaged_one() {
    let not_json = |line, column| Refusal::NotJson { line, column };
    let newer = |format| Refusal::NewerFormat {
        format,
        newest: FORMAT,
    };
    let rows = [
        (String::new(), not_json(1, 1)),
        ("motor list".to_owned(), not_json(1, 1)),
        (format!("{ORDINARY}{{}}"), not_json(60, 1)),
        (
            ORDINARY.replacen(r#""count": 2"#, r#""count": 02"#, 1),
            not_json(19, 33),
        ),
        (ORDINARY.replacen("480.0", "1e400", 1), not_json(11, 38)),
        (ORDINARY.replacen("480.0", "NaN", 1), not_json(11, 34)),
        ("[".repeat(100_000), not_json(1, 128)),
        ("null".to_owned(), Refusal::NotASheet),
        ("[1, 2]".to_owned(), Refusal::NotASheet),
        ("{}".to_owned(), Refusal::NotASheet),
        (
            replaced(r#""program": "ventrail""#, r#""program": "other""#),
            Refusal::NotASheet,
        ),
        (
            replaced(r#""program": "ventrail","#, ""),
            Refusal::NotASheet,
        ),
        (replaced(r#""format": 1,"#, ""), Refusal::NotASheet),
        (
            replaced(r#""format": 1"#, r#""format": 0"#),
            Refusal::NotASheet,
        ),
        (
            replaced(r#""format": 1"#, r#""format": "1""#),
            Refusal::NotASheet,
        ),
        (
            replaced(r#""format": 1"#, r#""format": 1.0"#),
            Refusal::NotASheet,
        ),
        (
            replaced(r#""format": 1"#, r#""format": 1, "format": 1"#),
            damaged("format", Fault::Repeated),
        ),
        (
            r#"{"format": 7, "program": "ventrail", "pages": {}}"#.to_owned(),
            newer(7),
        ),
        (replaced(r#""format": 1"#, r#""format": 2"#), newer(2)),
    ];
    for (text, refusal) in rows {
        let start: String = text.chars().take(60).collect();
        assert_eq!(
            read(&text),
            Err(refusal),
            "for a text which begins {start:?}"
        );
    }
}

#[test]
fn a_huge_text_is_refused_before_it_is_parsed() {
    let blanks = file::LARGEST_FILE - ORDINARY.len();
    let largest = format!("{ORDINARY}{}", " ".repeat(blanks));
    assert!(read(&largest).is_ok());
    let text = "x".repeat(file::LARGEST_FILE + 1);
    let refusal = Refusal::TooLarge {
        bytes: file::LARGEST_FILE + 1,
        most: file::LARGEST_FILE,
    };
    assert_eq!(read(&text), Err(refusal));
}

#[test]
fn the_largest_next_identity_is_taken() {
    let largest = format!("\"next_id\": {}", file::LARGEST_NEXT_ID);
    assert!(read(&replaced("\"next_id\": 9", &largest)).is_ok());
}

#[test]
fn a_text_of_very_many_values_is_refused() {
    let text = format!("[{}0]", "0,".repeat(file::MOST_VALUES));
    let refusal = Refusal::TooManyValues {
        most: file::MOST_VALUES,
    };
    assert_eq!(read(&text), Err(refusal));
}

#[test]
fn the_largest_sheet_fits_into_a_file_and_one_feeder_more_is_refused() {
    let record = full_record(Home::Feeder, 0);
    let feeders = |many: usize| -> Vec<Arc<Item>> {
        let ids = (0..).take(many).map(HolderId);
        ids.map(|id| {
            Arc::new(Item {
                id,
                record: record.clone(),
            })
        })
        .collect()
    };
    let of = |many| Document {
        sheet: Sheet {
            feeders: feeders(many),
            next_id: 10_000,
            ..Sheet::default()
        },
        ..Document::default()
    };
    let largest = of(MOST_FEEDERS);
    let text = write(&largest);
    assert!(2 * text.len() < file::LARGEST_FILE, "{} bytes", text.len());
    assert_eq!(read(&text), Ok(largest));
    let fault = Fault::TooMany { most: MOST_FEEDERS };
    assert_eq!(
        read(&write(&of(MOST_FEEDERS + 1))),
        Err(damaged("feeders", fault))
    );
}

#[test]
fn a_strange_name_is_cut_in_the_place_it_is_reported_at() {
    let name = "n".repeat(100_000);
    let Err(Refusal::Damaged(damage)) = read(&replaced("\"job\"", &format!("\"{name}\""))) else {
        panic!("an unknown name was taken");
    };
    assert!(damage.path.len() < 100, "{}", damage.path);
}

#[test]
fn whatever_edits_lead_to_can_be_opened_again() {
    let at = |holder, field| Place { holder, field };
    let gone = Holder::Feeder(HolderId(77));
    let note = |holder| NoteRef {
        place: at(holder, Field::MotorPower),
        kind: "no-load".to_owned(),
    };
    let long = "😀".repeat(2 * LONGEST_DRAFT);
    let edits = [
        Edit::AddFeeder { after: None },
        Edit::AddSource,
        Edit::Refuse(at(Holder::Sheet, Field::Altitude), long.clone()),
        Edit::Refuse(at(Holder::Sheet, Field::MotorPower), "x".to_owned()),
        Edit::Refuse(
            at(Holder::Feeder(HolderId(0)), Field::MotorPower),
            "\0".to_owned(),
        ),
        Edit::Refuse(at(gone, Field::MotorPower), "x".to_owned()),
        Edit::Answer(note(Holder::Sheet), long),
        Edit::Answer(note(Holder::Source(HolderId(1))), "seen".to_owned()),
        Edit::Answer(note(gone), "seen".to_owned()),
    ];
    let mut document = Document::default();
    for edit in edits {
        document = document.after(&edit);
        assert_eq!(
            read(&write(&document)).as_ref(),
            Ok(&document),
            "after {edit:?}"
        );
    }
    assert_eq!((document.drafts.len(), document.answers.len()), (2, 2));
}

proptest! {
    #[test]
    fn what_is_written_is_read_again_unchanged(document in any_document()) {
        let text = write(&document);
        let again = read(&text);
        prop_assert_eq!(again.as_ref(), Ok(&document));
        prop_assert_eq!(write(&again.unwrap()), text);
    }

    #[test]
    fn random_text_is_refused_without_a_panic(text in any::<String>()) {
        prop_assert!(read(&text).is_err());
    }

    #[test]
    fn a_file_cut_short_is_no_json(at in 0..ORDINARY.len() - 2) {
        let text = ORDINARY.get(..at).unwrap_or_default();
        let refused = matches!(read(text), Err(Refusal::NotJson { .. }));
        prop_assert!(refused);
    }

    /// Whatever still opens after damage is a sheet like any other.
    #[test]
    fn random_damage_never_panics_and_never_opens_a_sheet_which_cannot_be_kept(
        changes in proptest::collection::vec((any::<prop::sample::Index>(), any::<u8>()), 1..4),
    ) {
        let mut bytes = ORDINARY.as_bytes().to_vec();
        for (at, byte) in changes {
            *at.get_mut(&mut bytes) = byte;
        }
        let text = String::from_utf8_lossy(&bytes);
        if let Ok(document) = read(&text) {
            prop_assert_eq!(read(&write(&document)), Ok(document));
        }
    }
}

/// The saved files of a format, by path.
fn saved(format: u64) -> Vec<(PathBuf, String)> {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join(format!("tests/saved/v{format}"));
    let mut files: Vec<_> = fs::read_dir(&folder)
        .expect("every format has a folder of saved files")
        .map(|entry| entry.unwrap().path())
        .map(|path| (path.clone(), fs::read_to_string(path).unwrap()))
        .collect();
    assert!(!files.is_empty(), "no file in {}", folder.display());
    files.sort();
    files
}

/// The ordinary file with `old`, which stands in it once or more, replaced where it stands first.
#[track_caller]
fn replaced(old: &str, new: &str) -> String {
    assert!(ORDINARY.contains(old), "{old} does not stand in the file");
    ORDINARY.replacen(old, new, 1)
}

fn damaged(path: &str, fault: Fault) -> Refusal {
    Refusal::Damaged(Damage {
        path: path.to_owned(),
        fault,
    })
}

/// Sheets which together hold every choice of a sheet's own fields.
const FULL_SHEETS: usize = 7;
/// Feeders of each; with two runs each, enough for every size.
const FULL_FEEDERS: usize = 3;

/// A document with every field filled, the answers, units and sizes of which change with `turn`.
fn full_document(turn: usize) -> Document {
    let ids = (0..).map(HolderId);
    let mut records: Vec<Record> = (0..FULL_FEEDERS)
        .map(|row| full_record(Home::Feeder, turn * FULL_FEEDERS + row))
        .collect();
    records.push(full_record(Home::Source, turn));
    let mut feeders: Vec<Arc<Item>> = ids
        .zip(records)
        .map(|(id, record)| Arc::new(Item { id, record }))
        .collect();
    let sources = feeders.split_off(FULL_FEEDERS);
    Document {
        sheet: Sheet {
            record: full_record(Home::Sheet, turn),
            feeders,
            sources,
            next_id: 20,
        },
        ..Document::default()
    }
}

fn full_record(home: Home, turn: usize) -> Record {
    let mut record = Record::default();
    for field in fields_of(home) {
        record.set(field, full_entry(field, turn)).unwrap();
    }
    record
}

fn full_entry(field: Field, turn: usize) -> Entry {
    match spec(field).shape {
        Shape::Text { longest } => {
            let text = format!("{} {turn}", file::field_name(field));
            Entry::Text(text.chars().take(longest).collect())
        }
        Shape::Measured { kind, least, most } => {
            let units: Vec<Unit> = units_of(kind);
            let unit = units[turn % units.len()];
            // Rounded to eighths, so that the kept files are easy to read.
            let number = (unit.from_si(0.5 * (least + most)) * 8.0).round() / 8.0;
            Entry::Measured(Measured {
                number,
                unit,
                text: format!("{number} {}", file::unit_name(unit)),
            })
        }
        Shape::Count { .. } => Entry::Count(1),
        Shape::Choice(offered) => Entry::Choice(offered[turn % offered.len()]),
        Shape::Choices(offered) => Entry::Choices(
            offered
                .iter()
                .copied()
                .take(turn % offered.len() + 1)
                .collect(),
        ),
        Shape::Size => {
            let second = field == Field::Run(Run::Behind, RunField::Size);
            let position = 2 * turn + usize::from(second);
            Entry::Size(WireSize::ALL[position % WireSize::ALL.len()])
        }
    }
}

fn units_of(kind: Kind) -> Vec<Unit> {
    Unit::ALL
        .into_iter()
        .filter(|unit| unit.measures(kind))
        .collect()
}

/// Every name which a field can bring into a file.
fn names_of(field: Field) -> BTreeSet<String> {
    let mut names = BTreeSet::from([format!("field {field:?}")]);
    match spec(field).shape {
        Shape::Measured { kind, .. } => {
            names.extend(
                units_of(kind)
                    .into_iter()
                    .map(|unit| format!("unit {unit:?}")),
            );
        }
        Shape::Choice(offered) | Shape::Choices(offered) => {
            names.extend(offered.iter().map(|choice| format!("choice {choice:?}")));
        }
        Shape::Size => names.extend(WireSize::ALL.iter().map(|size| format!("size {size:?}"))),
        Shape::Text { .. } | Shape::Count { .. } => {}
    }
    names
}

/// Every name which a document brings into a file.
fn names_in(document: &Document) -> BTreeSet<String> {
    let sheet = &document.sheet;
    let items = sheet.feeders.iter().chain(&sheet.sources);
    let records = items.map(|item| &item.record).chain([&sheet.record]);
    let mut names = BTreeSet::new();
    for (field, entry) in records.flat_map(Record::iter) {
        names.insert(format!("field {field:?}"));
        names.extend(match entry {
            Entry::Measured(measured) => vec![format!("unit {:?}", measured.unit)],
            Entry::Choice(choice) => vec![format!("choice {choice:?}")],
            Entry::Choices(choices) => choices
                .iter()
                .map(|choice| format!("choice {choice:?}"))
                .collect(),
            Entry::Size(size) => vec![format!("size {size:?}")],
            Entry::Text(_) | Entry::Count(_) => Vec::new(),
        });
    }
    names
}
