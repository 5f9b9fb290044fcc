//! Whole example sheets: they open, write back to the byte, and work out.
//!
//! The data of the example sheets are invented: nothing here compares them with the outside world, and no value of
//! theirs is an expected value anywhere.

use std::fs;
use std::sync::Arc;
use ventrail::file;
use ventrail::sheet::Document;
use ventrail::work::{Worked, work_out};
use ventrail::working::{Amount, Figure, Grade, Origin, Term};

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
        let figures = figures_of(&worked);
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

#[track_caller]
fn check_finite(name: &str, rule: &str, amount: Amount) {
    if let Amount::Measured { si, .. } = amount {
        assert!(si.is_finite(), "{name}: {rule} gives {si}");
    }
}

/// Every figure which the totals, the heat ledger, the feeders and the notes show, and every figure below them.
fn figures_of(worked: &Worked) -> Vec<Arc<Figure>> {
    let mut found = Vec::new();
    let totals = worked
        .totals
        .iter()
        .filter_map(|total| total.figure.as_ref());
    let ledger = worked
        .ledger
        .rows
        .iter()
        .flat_map(|row| [&row.running, &row.connected]);
    let feeders = worked.feeders.iter().flat_map(|feeder| {
        let of_runs = feeder.runs().flat_map(|run| {
            [
                Some(&run.required),
                run.size.as_ref(),
                run.ampacity.as_ref(),
                run.drop_ratio.as_ref(),
                run.grounding.as_ref(),
                run.heat.as_ref(),
            ]
        });
        of_runs
            .chain([
                feeder.drop_ratio.as_ref(),
                feeder.disconnect.as_ref(),
                feeder.heat.total.as_ref(),
            ])
            .flatten()
    });
    let notes = worked.notes.iter().flat_map(|note| &note.figures);
    for figure in totals.chain(ledger).chain(feeders).chain(notes) {
        gather(figure, &mut found);
    }
    found
}

fn gather(figure: &Arc<Figure>, found: &mut Vec<Arc<Figure>>) {
    found.push(Arc::clone(figure));
    for Term { origin, .. } in &figure.terms {
        if let Origin::Figure(below) = origin {
            gather(below, found);
        }
    }
}
