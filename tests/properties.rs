//! What must hold for every sheet, held against random ones: monotony, balance, limits, and results that agree.
//!
//! Random sheets are those of `common/random_sheets.rs`; runs and devices of their own are drawn here where a rule wants
//! its inputs held fixed but for one.

#![allow(
    clippy::expect_used,
    clippy::panic,
    reason = "helpers of tests stop at the first surprise"
)]

#[path = "common/random_sheets.rs"]
mod random_sheets;
#[path = "common/worked_figures.rs"]
mod worked_figures;

use proptest::prelude::*;
use proptest::sample::{Index, select, subsequence};
use proptest::test_runner::TestRunner;
use random_sheets::{any_document, any_entry, any_sheet, any_text, ordinary_sheet};
use std::collections::BTreeSet;
use std::sync::Arc;
use ventrail::assume::AssumedValue;
use ventrail::math::reaches;
use ventrail::physics::circuit::{DropRun, voltage_drop};
use ventrail::quantity::{
    AirFlow, ApparentPower, Area, CrossSection, Current, Density, Frequency, ImpedancePerLength,
    Inductance, Kind, Length, LengthPerImpedance, Power, Pressure, Quantity, Ratio, ShaftPower,
    SpecificHeat, Temperature, TemperatureDifference, Transmittance, Unit, Voltage, WireSize,
};
use ventrail::sheet::{
    Choice, Document, Edit, Entry, Home, Measured, NoteRef, Record, Sheet, fields_of, home,
};
use ventrail::sizing::conductor::{
    Conductors, RunInput, Surrounding, Terminal, demand_of, size_run, terminal_column,
};
use ventrail::sizing::device::{DeviceInput, size_branch_device};
use ventrail::sizing::rules;
use ventrail::tables::nec_chapter_9::{IMPEDANCE_ROWS, area};
use ventrail::tables::nec_conductors::AMBIENT_BANDS;
use ventrail::tables::nec_ratings::ratings;
use ventrail::tables::{Column, Conduit, DeviceType, Edition, Metal};
use ventrail::work::{
    LedgerGroup, Total, TotalKind, Verdict, Worked, WorkedFeeder, work_again, work_out,
};
use ventrail::working::{
    Amount, Field, Figure, Given, Grade, Holder, HolderId, Ink, MarginNote, NoteKind, Origin,
    Place, Run, RunField,
};
use worked_figures::{every_figure, figures_of_feeder};

const EDITION: Edition = Edition::Nec2023;

/// What sums of the same heats in another order may differ by.
const SUMMING: f64 = 1e-12;

fn cases(cases: u32) -> ProptestConfig {
    ProptestConfig {
        cases,
        failure_persistence: None,
        ..ProptestConfig::default()
    }
}

// --- every sheet ----------------------------------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(120))]

    #[test]
    fn any_sheet_works_out_to_finite_numbers_alone(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for figure in every_figure(&worked) {
            let is_finite = amounts_of(&figure).all(is_finite);
            prop_assert!(is_finite, "{figure:?}");
        }
        for note in &worked.notes {
            prop_assert!(!names_what_is_no_number(&format!("{:?}", note.kind)), "{:?}", note.kind);
        }
        for total in &worked.totals {
            let amounts = [total.running, total.connected, total.limit];
            prop_assert!(amounts.into_iter().flatten().all(is_finite), "{total:?}");
        }
        for assumption in &worked.assumptions {
            if let AssumedValue::Amount(amount) = assumption.value {
                prop_assert!(is_finite(amount), "{assumption:?}");
            }
        }
    }
}

fn amounts_of(figure: &Figure) -> impl Iterator<Item = Amount> + '_ {
    std::iter::once(figure.value).chain(figure.terms.iter().map(|term| term.amount))
}

fn is_finite(amount: Amount) -> bool {
    match amount {
        Amount::Measured { si, .. } => si.is_finite(),
        Amount::Count(_) | Amount::Size(_) => true,
    }
}

/// Whether a value which is written for the eyes of a developer has a number in it which is none. What stands between
/// quotes was typed by somebody.
fn names_what_is_no_number(shown: &str) -> bool {
    let mut plain = String::new();
    let mut characters = shown.chars();
    while let Some(character) = characters.next() {
        if character != '"' {
            plain.push(character);
            continue;
        }
        while let Some(quoted) = characters.next() {
            match quoted {
                '\\' => {
                    characters.next();
                }
                '"' => break,
                _ => {}
            }
        }
    }
    plain
        .split(|character: char| !character.is_alphanumeric())
        .any(|word| matches!(word, "NaN" | "inf"))
}

#[test]
fn a_number_which_is_none_is_seen_where_it_stands() {
    let note = |kind: NoteKind| format!("{kind:?}");
    let rating = Current::amperes(f64::NAN);
    assert!(names_what_is_no_number(&note(
        NoteKind::GroundingBeyondTable { rating }
    )));
    let rating = Current::amperes(f64::NEG_INFINITY);
    assert!(names_what_is_no_number(&note(
        NoteKind::GroundingBeyondTable { rating }
    )));
    let tag = "NaN \\ \" inf".to_owned();
    assert!(!names_what_is_no_number(&note(NoteKind::TagRepeated {
        tag
    })));
}

proptest! {
    #![proptest_config(cases(40))]

    /// Each edit on the result of the one before, so that what is taken over has been taken over before.
    #[test]
    fn working_again_after_any_edits_gives_what_working_anew_gives(
        document in any_document(),
        edits in proptest::collection::vec(any_edit(), 1..5),
    ) {
        let mut document = document;
        let mut worked = work_out(&document.sheet);
        for edit in &edits {
            document = document.after(&resolved(edit, &document.sheet));
            worked = work_again(&document.sheet, &worked);
            prop_assert!(worked == work_out(&document.sheet), "after {edit:?}");
        }
    }

    /// The kinds of edit which change one number of a sheet that works out, where the band of air may or may not change.
    #[test]
    fn working_again_after_an_ordinary_edit_gives_what_working_anew_gives(
        sheet in ordinary_sheet(),
        edits in proptest::collection::vec(ordinary_edit(), 1..5),
    ) {
        let mut document = Document { sheet, ..Document::default() };
        let mut worked = work_out(&document.sheet);
        for edit in &edits {
            document = document.after(&resolved(edit, &document.sheet));
            worked = work_again(&document.sheet, &worked);
            prop_assert!(worked == work_out(&document.sheet), "after {edit:?}");
        }
    }
}

/// An edit before it is known which holders there are.
#[derive(Debug, Clone)]
enum AnyEdit {
    Set(Home, Index, Field, Entry),
    Clear(Home, Index, Field),
    Refuse(Home, Index, Field, String),
    Answer(Home, Index, Field, String),
    AddFeeder(Option<Index>),
    DuplicateFeeder(Index),
    DeleteFeeder(Index),
    MoveFeeder(Index, bool),
    AddSource,
    DeleteSource(Index),
    Replace(Box<Document>),
}

fn any_home() -> impl Strategy<Value = Home> {
    select(vec![Home::Sheet, Home::Feeder, Home::Feeder, Home::Source])
}

fn any_field() -> impl Strategy<Value = (Home, Field)> {
    any_home().prop_flat_map(|home| (Just(home), select(fields_of(home))))
}

fn any_edit() -> impl Strategy<Value = AnyEdit> {
    let which = any::<Index>;
    prop_oneof![
        6 => (any_field(), which()).prop_flat_map(|((home, field), which)| {
            any_entry(field).prop_map(move |entry| AnyEdit::Set(home, which, field, entry))
        }),
        3 => (any_field(), which()).prop_map(|((home, field), which)| AnyEdit::Clear(home, which, field)),
        1 => (any_field(), which(), any_text(20))
            .prop_map(|((home, field), which, text)| AnyEdit::Refuse(home, which, field, text)),
        1 => (any_field(), which(), any_text(20))
            .prop_map(|((home, field), which, text)| AnyEdit::Answer(home, which, field, text)),
        2 => proptest::option::of(which()).prop_map(AnyEdit::AddFeeder),
        2 => which().prop_map(AnyEdit::DuplicateFeeder),
        2 => which().prop_map(AnyEdit::DeleteFeeder),
        2 => (which(), any::<bool>()).prop_map(|(which, up)| AnyEdit::MoveFeeder(which, up)),
        1 => Just(AnyEdit::AddSource),
        1 => which().prop_map(AnyEdit::DeleteSource),
        1 => any_document().prop_map(|document| AnyEdit::Replace(Box::new(document))),
    ]
}

/// Edits of the values on which the band of air, the site and one feeder depend.
fn ordinary_edit() -> impl Strategy<Value = AnyEdit> {
    let fields = vec![
        (Home::Sheet, Field::RoomAmbient),
        (Home::Sheet, Field::InsideLimit),
        (Home::Sheet, Field::Cooling),
        (Home::Sheet, Field::EnclosureHeight),
        (Home::Sheet, Field::SunHeat),
        (Home::Sheet, Field::SupplyVoltage),
        (Home::Feeder, Field::DriveLoss),
        (Home::Feeder, Field::MotorPower),
        (Home::Feeder, Field::Running),
        (Home::Source, Field::SourceHeat),
    ];
    (select(fields), any::<Index>()).prop_flat_map(|((home, field), which)| {
        random_sheets::ordinary_entry(field)
            .prop_map(move |entry| AnyEdit::Set(home, which, field, entry))
    })
}

/// The edit for a sheet; where it has no such holder, for one which it never had.
fn resolved(edit: &AnyEdit, sheet: &Sheet) -> Edit {
    let nobody = HolderId(sheet.next_id);
    let feeder = |which: &Index| match sheet.feeders.as_slice() {
        [] => nobody,
        feeders => which.get(feeders).id,
    };
    let source = |which: &Index| match sheet.sources.as_slice() {
        [] => nobody,
        sources => which.get(sources).id,
    };
    let place = |home: &Home, which: &Index, field: &Field| Place {
        holder: match home {
            Home::Sheet => Holder::Sheet,
            Home::Feeder => Holder::Feeder(feeder(which)),
            Home::Source => Holder::Source(source(which)),
        },
        field: *field,
    };
    match edit {
        AnyEdit::Set(home, which, field, entry) => {
            Edit::Set(place(home, which, field), entry.clone())
        }
        AnyEdit::Clear(home, which, field) => Edit::Clear(place(home, which, field)),
        AnyEdit::Refuse(home, which, field, text) => {
            Edit::Refuse(place(home, which, field), text.clone())
        }
        AnyEdit::Answer(home, which, field, text) => Edit::Answer(
            NoteRef {
                place: place(home, which, field),
                kind: "no-load".to_owned(),
            },
            text.clone(),
        ),
        AnyEdit::AddFeeder(after) => Edit::AddFeeder {
            after: after.as_ref().map(feeder),
        },
        AnyEdit::DuplicateFeeder(which) => Edit::DuplicateFeeder(feeder(which)),
        AnyEdit::DeleteFeeder(which) => Edit::DeleteFeeder(feeder(which)),
        AnyEdit::MoveFeeder(which, up) => Edit::MoveFeeder {
            id: feeder(which),
            up: *up,
        },
        AnyEdit::AddSource => Edit::AddSource,
        AnyEdit::DeleteSource(which) => Edit::DeleteSource(source(which)),
        AnyEdit::Replace(document) => Edit::Replace(document.clone()),
    }
}

// --- what was entered and what was assumed --------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(70))]

    #[test]
    fn nothing_which_was_entered_is_reported_as_assumed(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        let mut reported = BTreeSet::new();
        for assumption in &worked.assumptions {
            let place = assumption.place;
            prop_assert!(sheet.has(place), "{assumption:?} stands nowhere");
            prop_assert!(entry_at(&sheet, place).is_none(), "{assumption:?} was entered");
            prop_assert!(reported.insert(place), "{assumption:?} is reported twice");
        }
    }

    /// Every term of a feeder's working which says that it was entered stands in the sheet with that value, and every
    /// one which says that it was assumed stands in the list of assumptions and not in the sheet.
    #[test]
    fn every_term_says_truly_whether_it_was_entered(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        let assumed: BTreeSet<Place> = worked.assumptions.iter().map(|assumption| assumption.place).collect();
        for feeder in &worked.feeders {
            for figure in figures_of_feeder(feeder) {
                for term in &figure.terms {
                    let field = match term.origin {
                        Origin::Entered(field) | Origin::Assumed(field) => field,
                        Origin::Constant | Origin::Figure(_) => continue,
                    };
                    let place = place_of(feeder, field);
                    let entry = entry_at(&sheet, place);
                    if matches!(term.origin, Origin::Entered(_)) {
                        prop_assert!(entry.is_some_and(|entry| is_amount(entry, term.amount)), "{figure:?}");
                    } else {
                        prop_assert!(entry.is_none(), "{figure:?}");
                        prop_assert!(assumed.contains(&place), "{place:?} is used and not reported: {figure:?}");
                    }
                }
            }
        }
    }

    /// What a rule filled in is in the list of assumptions with its value, and stands for a field which is empty.
    #[test]
    fn what_a_rule_fills_in_is_reported_as_assumed(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for feeder in &worked.feeders {
            let by_rule = [
                (Field::DriveInput, feeder.drive_input.as_ref().map(|given| (given.ink(), Amount::from(given.value)))),
                (Field::DriveLoss, inked(feeder.heat.drive.as_ref())),
                (Field::DeviceLoss, inked(feeder.heat.device.as_ref())),
                (Field::ReactorLoss, inked(feeder.heat.reactor.as_ref())),
            ];
            for (field, given) in by_rule {
                let Some((ink, amount)) = given else {
                    continue;
                };
                let place = place_of(feeder, field);
                let is_entered = entry_at(&sheet, place).is_some();
                prop_assert_eq!(ink, if is_entered { Ink::Entered } else { Ink::Assumed }, "{:?}", place);
                let reported = worked.assumptions.iter().find(|assumption| assumption.place == place);
                let reported = reported.map(|assumption| &assumption.value);
                let wanted = AssumedValue::Amount(amount);
                prop_assert_eq!(reported, (!is_entered).then_some(&wanted), "{:?}", place);
            }
        }
    }
}

fn inked(heat: Option<&Given<Power>>) -> Option<(Ink, Amount)> {
    heat.map(|heat| (heat.ink(), heat.value.into()))
}

fn place_of(feeder: &WorkedFeeder, field: Field) -> Place {
    Place {
        holder: match home(field) {
            Home::Feeder => Holder::Feeder(feeder.id),
            _ => Holder::Sheet,
        },
        field,
    }
}

fn entry_at(sheet: &Sheet, place: Place) -> Option<&Entry> {
    sheet.record(place.holder)?.get(place.field)
}

fn is_amount(entry: &Entry, amount: Amount) -> bool {
    match (entry, amount) {
        (Entry::Measured(measured), Amount::Measured { si, .. }) => {
            measured.si().to_bits() == si.to_bits()
        }
        (Entry::Count(entered), Amount::Count(count)) => *entered == count,
        (Entry::Size(entered), Amount::Size(size)) => *entered == size,
        // A choice, such as the material of the walls, stands for the number which belongs to it.
        (Entry::Choice(_), _) => true,
        _ => false,
    }
}

// --- findings and totals --------------------------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(70))]

    #[test]
    fn every_finding_is_at_a_place_which_exists_and_stops_come_first(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for note in &worked.notes {
            prop_assert!(sheet.has(note.place), "{note:?}");
        }
        let grades: Vec<Grade> = worked.notes.iter().map(|note| note.grade).collect();
        prop_assert!(grades.is_sorted(), "{grades:?}");
    }

    #[test]
    fn a_total_is_beyond_its_limit_exactly_where_a_stop_says_so(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for total in &worked.totals {
            let stands = worked.notes.iter().any(|note| is_stop_of(note, total));
            prop_assert_eq!(total.verdict == Verdict::Beyond, stands, "{:?}\n{:?}", total, worked.notes);
        }
    }

    #[test]
    fn a_total_is_within_only_where_its_value_and_limit_are_known_and_in_order(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for total in &worked.totals {
            if total.verdict == Verdict::Within {
                prop_assert!(is_in_order(total), "{total:?}");
            }
        }
        let fault = total_of(&worked, TotalKind::FaultCurrent);
        let is_loaded = |feeder: &&Arc<WorkedFeeder>| feeder.device.is_some();
        let unrated = worked.feeders.iter().filter(is_loaded).any(|feeder| feeder.short_circuit_rating.is_none());
        let main_unrated = entry_at(&sheet, Place { holder: Holder::Sheet, field: Field::MainShortCircuitRating }).is_none();
        if unrated || main_unrated {
            prop_assert_ne!(fault.verdict, Verdict::Within, "a rating is missing");
        }
    }

    /// What is unfolded at a total is the working of its value; at the main device, of its limit.
    #[test]
    fn the_working_beside_a_total_is_its_own(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed(), sealed_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for total in &worked.totals {
            let wanted = match total.kind {
                TotalKind::MainDevice => total.limit,
                _ => total.running,
            };
            if let Some(figure) = &total.figure {
                prop_assert_eq!(Some(figure.value), wanted, "{:?}", total);
            }
        }
    }

    #[test]
    fn what_runs_together_is_never_more_than_what_is_connected(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for kind in [TotalKind::Heat, TotalKind::IncomingCurrent] {
            let total = total_of(&worked, kind);
            if let (Some(running), Some(connected)) = (si(total.running), si(total.connected)) {
                prop_assert!(reaches(connected, running), "{total:?}");
            }
        }
    }

    /// The order of the rows is the person's: nothing which is summed may depend on it.
    #[test]
    fn the_order_of_the_feeders_changes_no_total(sheet in ordinary_sheet(), first in any::<Index>(), second in any::<Index>()) {
        prop_assume!(!sheet.feeders.is_empty());
        let mut other = sheet.clone();
        other.feeders.swap(first.index(sheet.feeders.len()), second.index(sheet.feeders.len()));
        let (one, other) = (work_out(&sheet), work_out(&other));
        for (one, other) in one.totals.iter().zip(&other.totals) {
            prop_assert_eq!(one.verdict, other.verdict);
            for (a, b) in [(one.running, other.running), (one.connected, other.connected), (one.limit, other.limit)] {
                let is_same = match (si(a), si(b)) {
                    (Some(a), Some(b)) => is_close(a, b),
                    (a, b) => a.is_none() && b.is_none(),
                };
                prop_assert!(is_same, "{one:?}\n{other:?}");
            }
        }
    }
}

/// The stop which goes with a total beyond its limit.
fn is_stop_of(note: &MarginNote, total: &Total) -> bool {
    let is_it = match (total.kind, &note.kind) {
        (TotalKind::InsideTemperature, NoteKind::InsideAboveLimit { .. })
        | (TotalKind::Airflow, NoteKind::AirflowShort { .. })
        | (TotalKind::MainDevice, NoteKind::MainAboveMaximum { .. })
        | (TotalKind::FaultCurrent, NoteKind::FaultAboveRating { .. }) => true,
        // No ampacity at all carries nothing.
        (
            TotalKind::IncomingCurrent,
            NoteKind::ConductorTooSmall { run, .. }
            | NoteKind::NoConductorFits { run, .. }
            | NoteKind::AmbientBeyondInsulation { run, .. }
            | NoteKind::SizeNotInTable { run, .. },
        ) => *run == Run::Incoming,
        _ => false,
    };
    is_it && note.grade == Grade::Stop
}

fn total_of(worked: &Worked, kind: TotalKind) -> &Total {
    worked
        .totals
        .iter()
        .find(|total| total.kind == kind)
        .expect("every kind of total is always there")
}

fn si(amount: Option<Amount>) -> Option<f64> {
    match amount? {
        Amount::Measured { si, .. } => Some(si),
        Amount::Count(_) | Amount::Size(_) => None,
    }
}

fn is_in_order(total: &Total) -> bool {
    let (Some(running), Some(limit)) = (si(total.running), si(total.limit)) else {
        return false;
    };
    reaches(limit, running)
}

fn is_close(a: f64, b: f64) -> bool {
    (a - b).abs() <= SUMMING * a.abs().max(b.abs())
}

// --- heat and the air inside ----------------------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(70))]

    #[test]
    fn the_heat_in_all_is_the_sum_of_its_rows_and_of_its_sources(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        let ledger = &worked.ledger;
        let rows = |of: fn(&ventrail::work::LedgerRow) -> f64| ledger.rows.iter().map(of).sum::<f64>();
        prop_assert!(is_close(watts(&ledger.running), rows(|row| watts(&row.running))));
        prop_assert!(is_close(watts(&ledger.connected), rows(|row| watts(&row.connected))));
        for group in GROUPS {
            let row = ledger.rows.iter().find(|row| row.group == group);
            let by_sources = heats_of(&worked, &sheet, group);
            let (running, connected) = row.map_or((0.0, 0.0), |row| (watts(&row.running), watts(&row.connected)));
            let sum = |counts: fn(&(bool, f64)) -> bool| by_sources.iter().filter(|source| counts(source)).map(|(_, heat)| heat).sum::<f64>();
            prop_assert!(is_close(running, sum(|(is_running, _)| *is_running)), "{group:?}: {running} {by_sources:?}");
            prop_assert!(is_close(connected, sum(|_| true)), "{group:?}: {connected} {by_sources:?}");
        }
    }

    /// Each feeder's own total is that of its parts.
    #[test]
    fn the_heat_of_a_feeder_is_the_sum_of_its_parts(sheet in ordinary_sheet()) {
        for feeder in &work_out(&sheet).feeders {
            let heat = &feeder.heat;
            let given = |heat: &Option<Given<Power>>| heat.as_ref().map_or(0.0, |heat| heat.value.to_watts());
            let figure = |heat: &Option<Arc<Figure>>| heat.as_deref().map_or(0.0, watts);
            let parts = figure(&heat.drive_inside) + given(&heat.reactor) + given(&heat.device) + figure(&heat.conductors);
            prop_assert!(is_close(figure(&heat.total), parts), "{heat:?}");
        }
    }
}

/// In a sealed enclosure the air which comes out is that for which the sizes were chosen, and working the feeders for
/// just that air gives the same heat. Where a step of sizes leaves no such air, the warmer end stands, and is said.
#[test]
fn a_sealed_enclosure_settles_where_air_and_sizes_agree() {
    let seen = std::cell::RefCell::new(BTreeSet::new());
    let verdict = TestRunner::new(cases(120)).run(&sealed_sheet(), |sheet| {
        let settled = settles(&sheet)?;
        seen.borrow_mut().insert(settled);
        Ok(())
    });
    if let Err(failure) = verdict {
        panic!("{failure}");
    }
    let all = BTreeSet::from([
        Settled::Exactly,
        Settled::AtTheWarmerEnd,
        Settled::BeyondTheBands,
    ]);
    assert_eq!(seen.into_inner(), all, "a way to settle was not met");
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
enum Settled {
    Exactly,
    AtTheWarmerEnd,
    BeyondTheBands,
}

fn settles(sheet: &Sheet) -> Result<Settled, TestCaseError> {
    let worked = work_out(sheet);
    let air = &worked.enclosure.air;
    let inside = air.inside.as_ref().expect("walls are known").value;
    let by_heat: Temperature = air
        .sealed_inside
        .as_ref()
        .and_then(|figure| figure.quantity())
        .expect("walls are known");
    let heat = watts(&worked.ledger.running);
    let conductance =
        si(air.conductance.as_ref().map(|figure| figure.value)).expect("walls are known");
    let ambient = worked.enclosure.ambient.value.to_kelvin();
    prop_assert!(is_close(by_heat.to_kelvin(), ambient + heat / conductance));
    for conductors in worked.feeders.iter().flat_map(|feeder| feeder.runs()) {
        if let Surrounding::Inside { air } = conductors.input.surrounding {
            let air = air.expect("the air inside is known");
            prop_assert!(
                reaches(air.to_kelvin(), inside.to_kelvin()),
                "sized for {air:?}, the air is {inside:?}"
            );
        }
    }
    let kept = worked
        .notes
        .iter()
        .any(|note| matches!(note.kind, NoteKind::LoopKeptWarmerEnd { .. }));
    let celsius = inside.to_celsius();
    if !kept {
        prop_assert!(is_close(inside.to_kelvin(), by_heat.to_kelvin()));
        if celsius > 85.0 {
            return Ok(Settled::BeyondTheBands);
        }
        let again = heat_at(sheet, celsius);
        prop_assert!(
            is_close(heat, again),
            "{heat} W make {celsius} °C, at which the heat is {again} W"
        );
        return Ok(Settled::Exactly);
    }
    // No exact air: the cooler band's sizes make it warmer than that band, the warmer band's make it cooler.
    prop_assert!(
        EDGES.iter().any(|edge| (edge - celsius).abs() < 1e-9),
        "{celsius} is no edge of a band"
    );
    prop_assert!(by_heat < inside);
    let at_warmer = heat_at(sheet, celsius + 0.5);
    prop_assert!(
        is_close(heat, at_warmer),
        "kept {heat} W, at the warmer band {at_warmer} W"
    );
    let at_cooler = ambient + heat_at(sheet, celsius) / conductance;
    prop_assert!(
        at_cooler > inside.to_kelvin(),
        "{at_cooler} K fits the cooler band"
    );
    Ok(Settled::AtTheWarmerEnd)
}

proptest! {
    #![proptest_config(cases(70))]

    /// More heat, and hotter air around, never leave it cooler inside.
    #[test]
    fn more_heat_or_hotter_air_around_never_cools_the_inside(sheet in sealed_sheet(), more in 1.0..2_000.0_f64, hotter in 0.1..10.0_f64) {
        let inside = |sheet: &Sheet| work_out(sheet).enclosure.air.inside.map(|inside| inside.value.to_kelvin()).expect("walls are known");
        let before = inside(&sheet);
        let sun = sheet.record.quantity::<Power>(Field::SunHeat).map_or(0.0, Power::to_watts);
        let heated = with(&sheet, Field::SunHeat, measured(sun + more, Unit::Watt));
        prop_assert!(inside(&heated) >= before);
        let ambient: Temperature = sheet.record.quantity(Field::RoomAmbient).expect("ordinary sheets have it");
        // The routes in the field keep the air they had, so that only the enclosure is warmer.
        let warmer = with(&sheet, Field::RoomAmbient, measured(ambient.to_celsius() + hotter, Unit::Celsius));
        prop_assert!(inside(&warmer) >= before);
    }
}

/// The edges of the bands of air for which sizes inside hold.
const EDGES: [f64; 12] = [
    30.0, 35.0, 40.0, 45.0, 50.0, 55.0, 60.0, 65.0, 70.0, 75.0, 80.0, 85.0,
];

#[test]
fn the_bands_of_the_air_inside_are_those_of_the_ambient_table() {
    let edges: Vec<f64> = AMBIENT_BANDS
        .iter()
        .map(|band| band.up_to_celsius)
        .filter(|edge| *edge >= 30.0)
        .collect();
    assert_eq!(edges, EDGES);
}

/// An ordinary sheet whose enclosure is sealed, so that its air and its sizes depend on each other: of any walls, or of
/// walls which bring the air close to the edge of a band, where a step of sizes may leave no exact air.
fn sealed_sheet() -> impl Strategy<Value = Sheet> {
    let sealed = (ordinary_sheet(), 0.0..300.0_f64).prop_map(|(sheet, sun)| {
        let sheet = with(&sheet, Field::Cooling, Entry::Choice(Choice::Sealed));
        with(&sheet, Field::SunHeat, measured(sun, Unit::Watt))
    });
    (
        sealed,
        prop_oneof![3 => select(&EDGES[..]).boxed(), 1 => Just(85.0).boxed()],
        -0.2..0.2_f64,
        any::<bool>(),
    )
        .prop_map(|(sheet, edge, off, is_free)| {
            if is_free {
                return sheet;
            }
            let surface = si(work_out(&sheet)
                .enclosure
                .air
                .surface
                .map(|figure| figure.value))
            .expect("measures are known");
            let ambient: Temperature = sheet
                .record
                .quantity(Field::RoomAmbient)
                .expect("ordinary sheets have it");
            let coefficient =
                heat_at(&sheet, edge) / (surface * (edge + off - ambient.to_celsius()));
            if (0.1..30.0).contains(&coefficient) {
                with(
                    &sheet,
                    Field::WallCoefficient,
                    measured(coefficient, Unit::WattPerSquareMetreKelvin),
                )
            } else {
                sheet
            }
        })
}

/// The running heat with every feeder worked for air of this temperature: fans which hold it as their limit leave the
/// sizes nothing to settle.
fn heat_at(sheet: &Sheet, celsius: f64) -> f64 {
    let held = with(sheet, Field::Cooling, Entry::Choice(Choice::FilterFans));
    let held = with(&held, Field::InsideLimit, measured(celsius, Unit::Celsius));
    let worked = work_out(&held);
    let inside = worked
        .enclosure
        .air
        .inside
        .as_ref()
        .map(|inside| inside.value.to_celsius());
    assert!(
        inside.is_some_and(|inside| (inside - celsius).abs() < 1e-9),
        "{inside:?}"
    );
    watts(&worked.ledger.running)
}

fn with(sheet: &Sheet, field: Field, entry: Entry) -> Sheet {
    let mut next = sheet.clone();
    next.record.set(field, entry).expect("an entry which fits");
    next
}

fn with_in_feeder(sheet: &Sheet, id: HolderId, field: Field, entry: Entry) -> Sheet {
    let document = Document {
        sheet: sheet.clone(),
        ..Document::default()
    };
    let holder = Holder::Feeder(id);
    document
        .after(&Edit::Set(Place { holder, field }, entry))
        .sheet
}

fn measured(number: f64, unit: Unit) -> Entry {
    Entry::Measured(Measured {
        number,
        unit,
        text: format!("{number}"),
    })
}

const GROUPS: [LedgerGroup; 6] = [
    LedgerGroup::Drives,
    LedgerGroup::Reactors,
    LedgerGroup::Devices,
    LedgerGroup::Conductors,
    LedgerGroup::Others,
    LedgerGroup::Sun,
];

fn watts(figure: &Figure) -> f64 {
    figure.quantity::<Power>().expect("a heat").to_watts()
}

/// Every source of heat of a group, counted from the feeders and sources themselves: whether it runs, and its watts. The
/// main device's own heat is what its rows have beyond the feeders'; it is checked by its figure.
fn heats_of(worked: &Worked, sheet: &Sheet, group: LedgerGroup) -> Vec<(bool, f64)> {
    let of_feeder = |feeder: &Arc<WorkedFeeder>| -> Option<f64> {
        let heat = &feeder.heat;
        match group {
            LedgerGroup::Drives => heat.drive_inside.as_deref().map(watts),
            LedgerGroup::Reactors => heat.reactor.as_ref().map(|heat| heat.value.to_watts()),
            LedgerGroup::Devices => heat.device.as_ref().map(|heat| heat.value.to_watts()),
            LedgerGroup::Conductors => heat.conductors.as_deref().map(watts),
            LedgerGroup::Others | LedgerGroup::Sun => None,
        }
    };
    let mut found: Vec<(bool, f64)> = worked
        .feeders
        .iter()
        .filter_map(|feeder| Some((feeder.is_running, of_feeder(feeder)?)))
        .collect();
    match group {
        LedgerGroup::Others => found.extend(worked.sources.iter().filter_map(|source| {
            Some((source.is_running, source.heat.as_ref()?.value.to_watts()))
        })),
        LedgerGroup::Sun => found.extend(
            sheet
                .record
                .quantity::<Power>(Field::SunHeat)
                .map(|sun| (true, sun.to_watts())),
        ),
        LedgerGroup::Devices => found.extend(main_heat(worked, sheet).map(|heat| (true, heat))),
        _ => {}
    }
    found
}

/// Heat of the main device: as entered, else three poles at their limit by the square of the running current.
fn main_heat(worked: &Worked, sheet: &Sheet) -> Option<f64> {
    let entered: Option<Power> = sheet.record.quantity(Field::MainLoss);
    if let Some(entered) = entered {
        return Some(entered.to_watts());
    }
    let rating = worked.incoming.main.as_ref()?.rating.as_ref()?.value;
    let main = worked.incoming.main.as_ref()?.device.value;
    let limit = match main {
        DeviceType::InverseTimeBreaker => ventrail::tables::device_losses::breaker_pole(rating),
        _ => ventrail::tables::device_losses::fuse_link(rating),
    }?;
    let running: Current = worked.incoming.running.as_ref()?.quantity()?;
    let share = running.to_amperes() / rating.to_amperes();
    Some(3.0 * limit.loss.to_watts() * share * share)
}

// --- conductors -----------------------------------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(400))]

    /// At fixed sets, metal, place and column of the terminals.
    #[test]
    fn more_load_never_gives_a_smaller_conductor(run in any_run(), a in 0.1..1_500.0_f64, b in 0.1..1_500.0_f64) {
        let (less, more) = (a.min(b), a.max(b));
        let column = |amperes: f64| terminal_column(run.terminal.value, Current::amperes(1.25 * amperes));
        prop_assume!(column(less) == column(more));
        match (smallest(&run, less), smallest(&run, more)) {
            (Some(less), Some(more)) => prop_assert!(more >= less, "{less:?} {more:?}"),
            (None, more) => prop_assert_eq!(more, None, "less load fits nothing"),
            (Some(_), None) => {}
        }
    }

    #[test]
    fn hotter_air_never_gives_a_larger_ampacity(run in any_run(), size in any_size(), a in -40.0..90.0_f64, b in -40.0..90.0_f64) {
        let (cool, hot) = (a.min(b), a.max(b));
        let at = |celsius: f64| ampacity(&in_air(&run, celsius), size);
        prop_assert!(at(hot) <= at(cool), "{} A at {hot}, {} A at {cool}", at(hot), at(cool));
    }

    #[test]
    fn more_current_carrying_conductors_never_give_a_larger_ampacity(run in any_run(), size in any_size(), a in 1..120_u32, b in 1..120_u32) {
        let at = |carrying: u32| ampacity(&among(&run, carrying), size);
        prop_assert!(at(a.max(b)) <= at(a.min(b)));
    }

    #[test]
    fn more_sets_never_give_a_smaller_ampacity(run in any_run(), size in any_size(), a in 1..12_u32, b in 1..12_u32) {
        let at = |sets: u32| ampacity(&RunInput { sets: entered(sets), ..run.clone() }, size);
        prop_assert!(at(a.max(b)) >= at(a.min(b)));
    }

    /// The size which is chosen carries what is asked for, and the next smaller one of the table does not.
    #[test]
    fn the_chosen_conductor_is_the_smallest_which_carries_the_load(run in any_run(), amperes in 0.1..1_500.0_f64) {
        let Some(size) = smallest(&run, amperes) else {
            return Ok(());
        };
        let needed = 1.25 * amperes;
        let carries = |size: WireSize| reaches(usable(&run, size, amperes), needed);
        prop_assert!(carries(size));
        let least = match (run.sets.value, run.metal.value) {
            (2.., _) => WireSize::Awg1Over0,
            (_, Metal::Copper) => WireSize::Awg14,
            (_, Metal::Aluminium) => WireSize::Awg12,
        };
        prop_assert!(size >= least);
        for smaller in WireSize::ALL.into_iter().filter(|smaller| *smaller < size && *smaller >= least) {
            prop_assert!(!carries(smaller), "{smaller:?} would do, {size:?} was chosen");
        }
    }
}

#[test]
fn the_drop_falls_with_the_size_of_the_conductor() {
    // At a power factor of 0.1 the reactance decides, and 250 kcmil in steel has more of it than 4/0 AWG: no claim there.
    for power_factor in [0.2, 0.5, 0.8, 0.85, 0.9, 0.95, 1.0] {
        for metal in [Metal::Copper, Metal::Aluminium] {
            for conduit in [Conduit::Steel, Conduit::Pvc, Conduit::Aluminium] {
                let drops: Vec<f64> = IMPEDANCE_ROWS
                    .iter()
                    .filter_map(|row| row.impedance(metal, conduit))
                    .map(|impedance| {
                        let run = DropRun {
                            resistance: impedance.resistance,
                            reactance: impedance.reactance,
                            length: Length::metres(50.0),
                            sets: 1,
                        };
                        let power_factor = Ratio::of_one(power_factor);
                        voltage_drop(Current::amperes(10.0), power_factor, run).to_volts()
                    })
                    .collect();
                assert!(drops.len() >= 20);
                assert!(
                    drops.windows(2).all(|pair| pair.first() > pair.last()),
                    "{metal:?} in {conduit:?} at {power_factor}: {drops:?}"
                );
            }
        }
    }
}

proptest! {
    #![proptest_config(cases(120))]

    /// A run with the next larger size than the one worked out: no stop of its own, and nothing about it gets worse.
    #[test]
    fn one_size_up_never_hurts(sheet in ordinary_sheet(), which in any::<Index>(), is_ahead in any::<bool>()) {
        prop_assume!(!sheet.feeders.is_empty());
        let run = if is_ahead { Run::Ahead } else { Run::Behind };
        let id = which.get(&sheet.feeders).id;
        let bare = without_size(&sheet, id, run);
        let worked = work_out(&bare);
        let Some(before) = run_of(&worked, id, run) else {
            return Ok(());
        };
        let larger = |size: WireSize| WireSize::ALL.into_iter().find(|other| *other > size && ampacity(&before.input, *other) > 0.0);
        let Some(up) = before.smallest().and_then(larger) else {
            return Ok(());
        };
        let enlarged = with_in_feeder(&bare, id, Field::Run(run, RunField::Size), Entry::Size(up));
        let worked = work_out(&enlarged);
        let after = run_of(&worked, id, run).expect("the run is there as before");
        prop_assert_eq!(after.installed(), Some(up));
        let stops = worked.notes.iter().filter(|note| {
            note.grade == Grade::Stop
                && note.place == Place { holder: Holder::Feeder(id), field: Field::Run(run, RunField::Size) }
        });
        prop_assert_eq!(stops.count(), 0);
        let amperes = |conductors: &Conductors| si(conductors.ampacity.as_ref().map(|figure| figure.value));
        prop_assert!(amperes(after) >= amperes(before));
        let share = |conductors: &Conductors| si(conductors.drop_ratio.as_ref().map(|figure| figure.value));
        if let (Some(before_drop), Some(after_drop)) = (share(before), share(after))
            && before.input.power_factor.value >= Ratio::of_one(0.2)
        {
            prop_assert!(after_drop < before_drop);
        }
        let heat = |conductors: &Conductors| si(conductors.heat.as_ref().map(|figure| figure.value));
        if let (Some(before_heat), Some(after_heat)) = (heat(before), heat(after)) {
            prop_assert!(after_heat < before_heat);
        }
        let grounding = |conductors: &Conductors| conductors.grounding.as_ref().map(|figure| circular_mils(figure));
        prop_assert!(grounding(after) >= grounding(before), "the grounding conductor shrank");
    }

    #[test]
    fn a_grounding_conductor_is_never_larger_than_its_phase_conductor(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        let runs = worked.feeders.iter().flat_map(|feeder| feeder.runs()).chain(&worked.incoming.conductors);
        for conductors in runs {
            if let (Some(grounding), Some(phase)) = (&conductors.grounding, conductors.installed()) {
                prop_assert!(circular_mils(grounding) <= area(phase).to_circular_mils(), "{grounding:?}");
            }
        }
    }

    #[test]
    fn a_larger_device_never_gives_a_smaller_grounding_conductor(run in any_run(), amperes in 1.0..200.0_f64, a in 15.0..2_000.0_f64, b in 15.0..2_000.0_f64) {
        let conductors = sized(&run, amperes);
        let grounding = |amperes: f64| {
            let rating = Given::entered(Field::DeviceRating, Current::amperes(amperes));
            ventrail::sizing::grounding::grounding_of(&conductors, &rating, &mut Vec::new()).map(|figure| circular_mils(&figure))
        };
        prop_assert!(grounding(a.max(b)) >= grounding(a.min(b)));
    }
}

fn circular_mils(figure: &Figure) -> f64 {
    match figure.value {
        Amount::Size(size) => area(size).to_circular_mils(),
        other => panic!("{other:?} is no size"),
    }
}

fn run_of(worked: &Worked, id: HolderId, run: Run) -> Option<&Conductors> {
    let feeder = worked.feeders.iter().find(|feeder| feeder.id == id)?;
    match run {
        Run::Ahead => feeder.ahead.as_ref(),
        _ => feeder.behind.as_ref(),
    }
}

fn without_size(sheet: &Sheet, id: HolderId, run: Run) -> Sheet {
    let document = Document {
        sheet: sheet.clone(),
        ..Document::default()
    };
    let field = Field::Run(run, RunField::Size);
    let holder = Holder::Feeder(id);
    document.after(&Edit::Clear(Place { holder, field })).sheet
}

fn entered<T>(value: T) -> Given<T> {
    Given::entered(Field::Run(Run::Ahead, RunField::Place), value)
}

fn any_size() -> impl Strategy<Value = WireSize> {
    select(&WireSize::ALL[..])
}

/// A run of any kind; inside it is of copper, which is all that its table has.
fn any_run() -> impl Strategy<Value = RunInput> {
    let place = (any::<bool>(), -40.0..90.0_f64, 1..60_u32);
    let wire = (
        select(vec![Metal::Copper, Metal::Aluminium]),
        prop_oneof![3 => Just(1), 1 => 2..8_u32],
        select(vec![Column::C60, Column::C75, Column::C90]),
        select(vec![
            Terminal::Unmarked,
            Terminal::Marked60,
            Terminal::Marked75,
        ]),
        select(vec![Conduit::Steel, Conduit::Pvc, Conduit::Aluminium]),
    );
    (place, wire).prop_map(
        |((is_inside, celsius, carrying), (metal, sets, insulation, terminal, conduit))| {
            let air = Temperature::celsius(celsius);
            RunInput {
                run: Run::Ahead,
                surrounding: if is_inside {
                    Surrounding::Inside { air: Some(air) }
                } else {
                    Surrounding::Field {
                        ambient: entered(air),
                        carrying: entered(carrying),
                    }
                },
                metal: entered(if is_inside { Metal::Copper } else { metal }),
                sets: entered(sets),
                size: None,
                insulation: entered(insulation),
                terminal: entered(terminal),
                conduit: entered(conduit),
                length: Some(entered(Length::metres(10.0))),
                power_factor: entered(Ratio::of_one(0.85)),
            }
        },
    )
}

fn in_air(run: &RunInput, celsius: f64) -> RunInput {
    let air = Temperature::celsius(celsius);
    RunInput {
        surrounding: match &run.surrounding {
            Surrounding::Inside { .. } => Surrounding::Inside { air: Some(air) },
            Surrounding::Field { carrying, .. } => Surrounding::Field {
                ambient: entered(air),
                carrying: carrying.clone(),
            },
        },
        ..run.clone()
    }
}

fn among(run: &RunInput, carrying: u32) -> RunInput {
    RunInput {
        surrounding: Surrounding::Field {
            ambient: entered(Temperature::celsius(30.0)),
            carrying: entered(carrying),
        },
        ..run.clone()
    }
}

fn sized(run: &RunInput, amperes: f64) -> Conductors {
    let current = Given::entered(Field::DriveInput, Current::amperes(amperes));
    let demand = demand_of(&rules::INPUT_AMPACITY, "I_in", &current);
    let voltage = Given::entered(Field::SupplyVoltage, Voltage::volts(480.0));
    size_run(run, &demand, &voltage, &mut Vec::new()).expect("a demand in amperes")
}

fn smallest(run: &RunInput, amperes: f64) -> Option<WireSize> {
    sized(run, amperes).smallest()
}

/// Amperes which all conductors of a size carry for a load; none where the size or its insulation cannot be used.
fn usable(run: &RunInput, size: WireSize, load: f64) -> f64 {
    let run = RunInput {
        size: Some(size),
        ..run.clone()
    };
    si(sized(&run, load).ampacity.map(|figure| figure.value)).unwrap_or(0.0)
}

/// The same for a load of one ampere, which keeps unmarked terminals in one column.
fn ampacity(run: &RunInput, size: WireSize) -> f64 {
    usable(run, size, 1.0)
}

// --- branch devices -------------------------------------------------------------------------------------------------

const DEVICE_TYPES: [DeviceType; 4] = [
    DeviceType::TimeDelayFuse,
    DeviceType::NontimeDelayFuse,
    DeviceType::ClassCcFuse,
    DeviceType::InverseTimeBreaker,
];

proptest! {
    #![proptest_config(cases(400))]

    #[test]
    fn a_device_is_never_above_the_drives_limit_nor_of_a_type_not_permitted(
        device in select(&DEVICE_TYPES[..]),
        motor in 0.1..2_000.0_f64,
        input in proptest::option::of(0.1..2_000.0_f64),
        permitted in proptest::option::of(subsequence(&DEVICE_TYPES[..], 1..=4)),
        limit in proptest::option::of(prop_oneof![0.5..100.0_f64, 0.5..6_000.0_f64]),
    ) {
        let current = |field, amperes| Given::entered(field, Current::amperes(amperes));
        let permitted: Option<BTreeSet<DeviceType>> = permitted.map(|types| types.into_iter().collect());
        let mut notes = Vec::new();
        let sized = size_branch_device(&DeviceInput {
            device: Given::entered(Field::DeviceType, device),
            motor_current: current(Field::MotorCurrent, motor),
            drive_input: input.map(|input| current(Field::DriveInput, input)),
            permitted: permitted.clone(),
            largest: limit.map(|limit| current(Field::LargestPermitted, limit)),
            rating: None,
        }, EDITION, &mut notes);
        let Some(rating) = sized.rating.map(|rating| rating.value.to_amperes()) else {
            prop_assert!(notes.iter().any(|note| note.grade == Grade::Stop), "no rating, and no stop: {notes:?}");
            return Ok(());
        };
        prop_assert!(permitted.is_none_or(|permitted| permitted.contains(&device)));
        prop_assert!(limit.is_none_or(|limit| reaches(limit, rating)), "{rating} A");
        // By the rule: never above the next standard rating over the percentage.
        let per_cent = match device {
            DeviceType::TimeDelayFuse => 1.75,
            DeviceType::InverseTimeBreaker => 2.5,
            DeviceType::NontimeDelayFuse | DeviceType::ClassCcFuse => 3.0,
        };
        let below = ratings(device, EDITION).map(Current::to_amperes).filter(|standard| *standard < rating).last();
        prop_assert!(below.is_none_or(|below| !reaches(below, per_cent * motor)), "{rating} A is more than a size above");
        prop_assert!(ratings(device, EDITION).any(|standard| reaches(standard.to_amperes(), rating) && reaches(rating, standard.to_amperes())));
        prop_assert!(device != DeviceType::ClassCcFuse || rating <= 30.0);
    }

    #[test]
    fn a_larger_motor_never_gives_a_smaller_device(device in select(&DEVICE_TYPES[..]), a in 0.1..2_000.0_f64, b in 0.1..2_000.0_f64) {
        // Class CC ends: above, it gives none at all.
        let rating = |motor: f64| {
            let motor_current = Given::entered(Field::MotorCurrent, Current::amperes(motor));
            let input = DeviceInput {
                device: Given::entered(Field::DeviceType, device),
                motor_current,
                drive_input: None,
                permitted: None,
                largest: None,
                rating: None,
            };
            size_branch_device(&input, EDITION, &mut Vec::new()).rating.map(|rating| rating.value.to_amperes())
        };
        if let (Some(less), Some(more)) = (rating(a.min(b)), rating(a.max(b))) {
            prop_assert!(more >= less);
        }
        prop_assert!(rating(a.min(b)).is_some() || rating(a.max(b)).is_none());
    }
}

proptest! {
    #![proptest_config(cases(60))]

    /// The same in a sheet, where a rating which was entered against the limit has its stop.
    #[test]
    fn no_device_of_a_sheet_breaks_its_drives_limits_without_a_stop(sheet in prop_oneof![any_sheet().boxed(), ordinary_sheet().boxed()]) {
        let worked = work_out(&sheet);
        for feeder in &worked.feeders {
            let record: &Record = sheet.record(Holder::Feeder(feeder.id)).expect("the feeder's own record");
            let Some(rating) = feeder.device.as_ref().and_then(|device| device.rating.as_ref()) else {
                continue;
            };
            let breaks_limit = record
                .quantity::<Current>(Field::LargestPermitted)
                .is_some_and(|limit| !reaches(limit.to_amperes(), rating.value.to_amperes()));
            let breaks_type = record.choices(Field::PermittedTypes).is_some_and(|permitted| {
                record.choice(Field::DeviceType).is_some_and(|device| !permitted.contains(&device))
            });
            if breaks_limit || breaks_type {
                prop_assert!(record.quantity::<Current>(Field::DeviceRating).is_some(), "worked out against the limit");
                let stands = feeder.notes.iter().any(|note| note.grade == Grade::Stop && matches!(
                    note.kind,
                    NoteKind::DeviceAboveMaximum { .. }
                        | NoteKind::DeviceTypeNotPermitted { .. }
                        | NoteKind::LimitBelowStandard { .. }
                        | NoteKind::ClassCcTooSmall { .. }
                        | NoteKind::DeviceBeyondTable { .. }
                ));
                prop_assert!(stands, "{:?}", feeder.notes);
            }
        }
    }
}

// --- units ----------------------------------------------------------------------------------------------------------

proptest! {
    #![proptest_config(cases(400))]

    #[test]
    fn a_number_comes_back_through_its_unit(unit in select(&Unit::ALL[..]), number in -1e6..1e6_f64) {
        let back = unit.from_si(unit.to_si(number));
        // A temperature is stored from absolute zero: what it loses is a last bit of that.
        let lost = (back - number).abs();
        prop_assert!(lost <= 4e-16 * (number.abs() + 1_000.0), "{unit:?}: {number} came back as {back}");
    }
}

#[test]
fn every_unit_has_one_kind_but_those_of_active_and_shaft_power() {
    for unit in Unit::ALL {
        let kinds = KINDS.iter().filter(|kind| unit.measures(**kind)).count();
        let wanted = match unit {
            Unit::Watt | Unit::Kilowatt | Unit::Horsepower => 2,
            _ => 1,
        };
        assert_eq!(kinds, wanted, "{unit:?}");
    }
}

const KINDS: [Kind; 21] = [
    Kind::Current,
    Kind::Voltage,
    Kind::Power,
    Kind::ShaftPower,
    Kind::ApparentPower,
    Kind::ImpedancePerLength,
    Kind::Inductance,
    Kind::Frequency,
    Kind::Length,
    Kind::Area,
    Kind::CrossSection,
    Kind::Temperature,
    Kind::TemperatureDifference,
    Kind::Transmittance,
    Kind::HeatConductance,
    Kind::Pressure,
    Kind::Density,
    Kind::SpecificHeat,
    Kind::AirFlow,
    Kind::LengthPerImpedance,
    Kind::Ratio,
];

/// The units as the page knows them and the constructors as the tables use them are two lists: they must agree, and with
/// the definitions of the units (foot 0.3048 m, inch 25.4 mm, mechanical horsepower of motors 746 W).
#[test]
fn units_agree_with_the_quantities_and_with_their_definitions() {
    let circle = std::f64::consts::PI / 4.0 * 2.54e-5 * 2.54e-5;
    for (unit, quantity, defined) in [
        (Unit::Ampere, Current::amperes(1.0).si(), 1.0),
        (Unit::Kiloampere, Current::kiloamperes(1.0).si(), 1e3),
        (Unit::Volt, Voltage::volts(1.0).si(), 1.0),
        (Unit::Watt, Power::watts(1.0).si(), 1.0),
        (Unit::Kilowatt, Power::kilowatts(1.0).si(), 1e3),
        (Unit::Horsepower, ShaftPower::horsepower(1.0).si(), 746.0),
        (Unit::VoltAmpere, ApparentPower::volt_amperes(1.0).si(), 1.0),
        (
            Unit::KilovoltAmpere,
            ApparentPower::kilovolt_amperes(1.0).si(),
            1e3,
        ),
        (
            Unit::OhmPerThousandFeet,
            ImpedancePerLength::ohms_per_thousand_feet(1.0).si(),
            1.0 / 304.8,
        ),
        (Unit::Henry, Inductance::henries(1.0).si(), 1.0),
        (Unit::Millihenry, Inductance::millihenries(1.0).si(), 1e-3),
        (Unit::Hertz, Frequency::hertz(1.0).si(), 1.0),
        (Unit::Metre, Length::metres(1.0).si(), 1.0),
        (Unit::Millimetre, Length::millimetres(1.0).si(), 1e-3),
        (Unit::Foot, Length::feet(1.0).si(), 0.3048),
        (Unit::Inch, Length::inches(1.0).si(), 0.0254),
        (Unit::SquareMetre, Area::square_metres(1.0).si(), 1.0),
        (
            Unit::SquareMillimetre,
            CrossSection::square_millimetres(1.0).si(),
            1e-6,
        ),
        (
            Unit::CircularMil,
            CrossSection::circular_mils(1.0).si(),
            circle,
        ),
        (Unit::Celsius, Temperature::celsius(1.0).si(), 274.15),
        (
            Unit::Fahrenheit,
            Temperature::fahrenheit(1.0).si(),
            273.15 - 31.0 / 1.8,
        ),
        (Unit::Kelvin, Temperature::kelvin(1.0).si(), 1.0),
        (
            Unit::KelvinDifference,
            TemperatureDifference::kelvin(1.0).si(),
            1.0,
        ),
        (
            Unit::FahrenheitDifference,
            TemperatureDifference::fahrenheit_degrees(1.0).si(),
            1.0 / 1.8,
        ),
        (
            Unit::WattPerSquareMetreKelvin,
            Transmittance::watts_per_square_metre_kelvin(1.0).si(),
            1.0,
        ),
        (Unit::Pascal, Pressure::pascals(1.0).si(), 1.0),
        (
            Unit::KilogramPerCubicMetre,
            Density::kilograms_per_cubic_metre(1.0).si(),
            1.0,
        ),
        (
            Unit::JoulePerKilogramKelvin,
            SpecificHeat::joules_per_kilogram_kelvin(1.0).si(),
            1.0,
        ),
        (
            Unit::CubicMetrePerHour,
            AirFlow::cubic_metres_per_hour(1.0).si(),
            1.0 / 3600.0,
        ),
        (
            Unit::CubicFootPerMinute,
            AirFlow::cubic_feet_per_minute(1.0).si(),
            0.028_316_846_592 / 60.0,
        ),
        (
            Unit::FootPerOhm,
            LengthPerImpedance::feet_per_ohm(1.0).si(),
            0.3048,
        ),
        (Unit::One, Ratio::of_one(1.0).si(), 1.0),
        (Unit::PerCent, Ratio::per_cent(1.0).si(), 0.01),
    ] {
        let by_unit = unit.to_si(1.0);
        assert!(
            is_close(by_unit, quantity),
            "{unit:?}: {by_unit} {quantity}"
        );
        assert!(is_close(by_unit, defined), "{unit:?}: {by_unit} {defined}");
    }
}
