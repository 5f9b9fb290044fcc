//! Each rule reproduces printed values: the rows of `tests/published/`, each with its source.
//!
//! Besides, the checker itself is held to its word: no row passes with another expected value, and what it cannot read
//! it does not pass over.

#[path = "../examples/reference/mod.rs"]
mod reference;

use reference::folder::{check, rows_of};
use reference::rows::{COLUMNS, Expected, Row, read};
use reference::topics::{Work, all, topic_named};
use reference::verdict::{Verdict, judge};
use std::collections::BTreeSet;

#[test]
fn every_published_row_is_reproduced() {
    check("published");
}

/// A slip in a topic's name would let its row wait for ever.
#[test]
fn every_topic_of_a_row_is_in_the_list() {
    for (file, row) in kept_rows() {
        assert!(
            topic_named(&row.topic).is_some(),
            "{file}: {} has no topic {}",
            row.id,
            row.topic
        );
    }
}

#[test]
fn every_topic_has_a_row() {
    let kept: BTreeSet<String> = kept_rows().into_iter().map(|(_, row)| row.topic).collect();
    for topic in all() {
        assert!(kept.contains(topic.name), "no row asks for {}", topic.name);
    }
}

#[test]
fn every_topic_has_a_name_of_its_own() {
    let names: BTreeSet<_> = all().map(|topic| topic.name).collect();
    assert_eq!(names.len(), all().count());
}

#[test]
fn no_row_passes_with_another_expected_value() {
    let worked =
        |row: &Row| topic_named(&row.topic).is_some_and(|topic| matches!(topic.work, Work::Now(_)));
    for (file, row) in kept_rows() {
        for position in (0..row.expected.len()).filter(|_| worked(&row)) {
            let mut other = row.clone();
            if let Some(expected) = other.expected.get_mut(position) {
                expected.pair.value = another_value(expected);
                let changed = format!("{file}: {} {:?}", row.id, expected.pair);
                assert!(
                    matches!(judge(&other), Verdict::Failed(_)),
                    "{changed} passes"
                );
            }
        }
    }
}

/// A value which lies outside the tolerance of `expected`, or another word.
fn another_value(expected: &Expected) -> String {
    let value = expected.pair.value.as_str();
    let (first, others) = value
        .split_once(',')
        .map_or((value, None), |(a, b)| (a, Some(b)));
    // A size may be written as a number; the next one up is a size too.
    let is_size = matches!(expected.pair.key.as_str(), "size" | "table");
    let moved = match first.parse::<f64>() {
        _ if is_size && value == "18" => "16".to_owned(),
        _ if is_size => "18".to_owned(),
        Ok(number) => {
            let far = 4.0 * expected.tolerance.allowed(number) + 1e-6 * number.abs() + 1e-12;
            (number + far).to_string()
        }
        Err(_) => "1".to_owned(),
    };
    others.map_or(moved.clone(), |others| format!("{moved},{others}"))
}

fn kept_rows() -> Vec<(String, Row)> {
    let mut rows = rows_of("published");
    rows.extend(rows_of("independent"));
    rows
}

#[test]
fn an_unknown_input_fails_by_its_name() {
    let row = row_with("inputs", "current_a=28;colour=red");
    assert_fails(&row, "colour");
}

#[test]
fn a_unit_of_another_kind_fails_by_its_name() {
    assert_fails(&row_with("inputs", "current_v=28"), "current_v");
}

#[test]
fn a_missing_input_fails_by_its_name() {
    assert_fails(&row_with("inputs", ""), "current");
}

#[test]
fn an_input_which_is_no_number_fails() {
    assert_fails(&row_with("inputs", "current_a=many"), "current_a");
    assert_fails(&row_with("inputs", "current_a=nan"), "current_a");
}

#[test]
fn an_unknown_expected_key_fails_by_its_name() {
    assert_fails(&row_with("expected", "rating_a=32.2;colour=1"), "colour");
}

#[test]
fn nothing_where_a_value_comes_out_fails() {
    assert_fails(&row_with("expected", "rating_a=none"), "rating_a");
}

#[test]
fn a_value_just_outside_its_tolerance_fails() {
    let mut cells = ROW;
    cells[3] = "rating_a=32.3";
    cells[4] = "abs=0.09";
    assert_fails(&read_one(&cells), "32.3");
    cells[4] = "abs=0.11";
    assert!(matches!(judge(&read_one(&cells)), Verdict::Passed(_)));
}

#[test]
fn a_failure_names_both_values_and_how_far_they_are_apart() {
    let row = row_with("expected", "rating_a=30");
    let Verdict::Failed(troubles) = judge(&row) else {
        panic!("30 A passes for 32.2 A");
    };
    let said = reference::verdict::failure_in_full(&row, &troubles);
    for part in [
        "a-page",
        "a source",
        "current_a=28",
        "expected 30",
        "got 32.19",
        "times the tolerance",
    ] {
        assert!(said.contains(part), "{part} is missing in {said}");
    }
}

#[test]
fn a_topic_which_is_not_worked_is_unsupported() {
    for topic in ["dew point", "the weather"] {
        let row = row_with("topic", topic);
        assert!(matches!(judge(&row), Verdict::Unsupported(_)), "{topic}");
    }
}

#[test]
fn a_value_in_another_unit_is_the_same_value() {
    let mut cells = ROW;
    cells[2] = "current_ka=0.028";
    cells[3] = "rating_ka=0.0322";
    assert!(matches!(judge(&read_one(&cells)), Verdict::Passed(_)));
}

#[test]
fn a_file_with_a_hollow_row_is_not_read() {
    for (column, cell) in [
        ("id", ""),
        ("topic", ""),
        ("inputs", "current_a"),
        ("inputs", "current_a=28;current_a=29"),
        ("expected", ""),
        ("expected", "rating_a="),
        ("tolerance", ""),
        ("tolerance", "rel=1"),
        ("tolerance", "rel=0"),
        ("tolerance", "abs=40"),
        ("tolerance", "abs=inf"),
        ("tolerance", "rel=nan"),
        ("tolerance", "exact; abs=1"),
        ("tolerance", "colour abs=1"),
        ("ground", ""),
        ("ground", "computed with something"),
        ("ground", "own output"),
        ("source", ""),
        ("place", ""),
    ] {
        let cells = cells_with(column, cell);
        assert!(read(&file_of(&[cells])).is_err(), "{column}={cell} is read");
    }
}

#[test]
fn only_published_and_computed_rows_must_name_their_source() {
    for (ground, reads) in [
        ("published", false),
        ("computed with a library 1.2", false),
        ("derived", true),
        ("common practice", true),
        ("from memory", true),
    ] {
        let mut cells = ROW;
        cells[5] = ground;
        cells[6] = "";
        cells[7] = "";
        assert_eq!(read(&file_of(&[cells])).is_ok(), reads, "{ground}");
    }
}

#[test]
fn a_derived_row_must_give_its_recipe() {
    let mut cells = ROW;
    cells[5] = "derived";
    cells[8] = "";
    assert!(read(&file_of(&[cells])).is_err());
}

#[test]
fn a_file_with_other_columns_or_an_id_twice_is_not_read() {
    assert!(read("id,topic\n").is_err());
    assert!(read(&file_of(&[ROW, ROW])).is_err());
    assert!(read(&file_of(&[ROW])).is_ok());
}

/// A row which passes, cell by cell.
const ROW: [&str; 9] = [
    "one",
    "disconnect",
    "current_a=28",
    "rating_a=32.2",
    "exact",
    "published",
    "a source",
    "a-page",
    "a recipe",
];

fn cells_with<'a>(column: &str, cell: &'a str) -> [&'a str; 9] {
    let mut cells: [&str; 9] = ROW;
    for (name, place) in COLUMNS.iter().zip(&mut cells) {
        if *name == column {
            *place = cell;
        }
    }
    cells
}

#[track_caller]
fn row_with(column: &str, cell: &str) -> Row {
    read_one(&cells_with(column, cell))
}

#[track_caller]
fn read_one(cells: &[&str; 9]) -> Row {
    match read(&file_of(&[*cells])).map(|rows| rows.into_iter().next()) {
        Ok(Some(row)) => row,
        other => panic!("{cells:?} is not read: {other:?}"),
    }
}

fn file_of(rows: &[[&str; 9]]) -> String {
    let mut text = COLUMNS.join(",");
    for row in rows {
        let cells: Vec<_> = row.iter().map(|cell| format!("\"{cell}\"")).collect();
        text.push('\n');
        text.push_str(&cells.join(","));
    }
    text
}

#[track_caller]
fn assert_fails(row: &Row, naming: &str) {
    match judge(row) {
        Verdict::Failed(troubles) => {
            assert!(
                troubles.iter().any(|trouble| trouble.contains(naming)),
                "{troubles:?}"
            );
        }
        other => panic!("{row:?} does not fail: {other:?}"),
    }
}

#[test]
fn every_topic_and_key_is_described() {
    let guide = include_str!("../DEVELOPERS.md");
    for topic in all() {
        let section = match topic.work {
            Work::Now(_) => guide
                .split(&format!("**{}**", topic.name))
                .nth(1)
                .and_then(|rest| rest.split("\n**").next()),
            Work::Later => guide.split(&format!("- {}: ", topic.name)).nth(1),
        };
        let Some(section) = section else {
            panic!("{} is not described", topic.name);
        };
        for key in topic.inputs.iter().chain(topic.expected) {
            let is_described = [format!("`{}`", key.stem), format!("`{}_", key.stem)]
                .iter()
                .any(|written| section.contains(written));
            assert!(
                is_described,
                "{}: {} is not described",
                topic.name, key.stem
            );
        }
    }
}
