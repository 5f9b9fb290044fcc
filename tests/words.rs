//! Every sentence, label, symbol and number format: complete, distinct, clean, and rounded as it should be.

#[path = "common/random_sheets.rs"]
mod random_sheets;

use proptest::prelude::*;
use random_sheets::{any_sheet, ordinary_sheet};
use std::collections::BTreeSet;
use std::sync::Arc;
use ventrail::assume::AssumedValue;
use ventrail::entry;
use ventrail::file;
use ventrail::quantity::{
    AirFlow, Current, Kind, Length, Ratio, ShaftPower, Temperature, Unit, Voltage, WireSize,
};
use ventrail::sheet::{
    Choice, Entry, Home, Impossible, Measured, Shape, UnitSystem, fields_of, home, spec,
};
use ventrail::sizing::rules;
use ventrail::tables::DeviceType;
use ventrail::words::numbers::{Rounding, number};
use ventrail::words::{self, Piece, page};
use ventrail::work::{LedgerGroup, TotalKind, Verdict, Worked, work_out};
use ventrail::working::{
    Amount, Caution, Field, Figure, Form, Grade, Holder, HolderId, Ink, MarginNote, MemoryTable,
    NoteKind, Place, ReactorReason, Run, RunField, Term,
};

const SYSTEMS: [UnitSystem; 2] = [UnitSystem::Us, UnitSystem::Si];

fn every_field() -> Vec<Field> {
    [Home::Sheet, Home::Feeder, Home::Source]
        .into_iter()
        .flat_map(fields_of)
        .collect()
}

/// Words which may be shown: something is there, and nothing of the program shows through.
#[track_caller]
fn assert_clean(text: &str) {
    assert!(!text.trim().is_empty(), "no words");
    assert_eq!(text, text.trim(), "blanks around {text:?}");
    for sign in ["{", "}", "NaN", "  ", "Some(", "None", "..", " ,", " ."] {
        assert!(!text.contains(sign), "{sign:?} in {text:?}");
    }
    let is_infinite = |word: &str| word.trim_start_matches('−') == "inf";
    assert!(
        !text.split_whitespace().any(is_infinite),
        "infinite: {text:?}"
    );
}

#[track_caller]
fn assert_sentence(text: &str) {
    assert_clean(text);
    assert!(
        text.ends_with(['.', '?', '!']),
        "a sentence without an end: {text:?}"
    );
    assert!(
        text.starts_with(|first: char| !first.is_lowercase()),
        "a sentence without a beginning: {text:?}"
    );
}

#[track_caller]
fn assert_distinct(words: &[&str]) {
    let mut seen = BTreeSet::new();
    for word in words {
        assert_clean(word);
        assert!(seen.insert(*word), "{word:?} stands for two things");
    }
}

// Names.

#[test]
fn every_field_has_a_label_of_its_own() {
    let labels: Vec<&str> = every_field().into_iter().map(words::label).collect();
    assert_distinct(&labels);
}

#[test]
fn every_field_has_a_head_and_a_reason_for_being_assumed() {
    for field in every_field() {
        assert_clean(words::head(field));
        assert_clean(words::assumption_reason(field));
        assert_clean(words::gap(field));
    }
}

#[test]
fn heads_of_one_holder_are_distinct_within_each_group() {
    for holder in [Home::Sheet, Home::Feeder, Home::Source] {
        let plain: Vec<&str> = fields_of(holder)
            .into_iter()
            .filter(|field| !matches!(field, Field::Run(..)))
            .map(words::head)
            .collect();
        assert_distinct(&plain);
    }
    let of_runs: Vec<&str> = ventrail::sheet::MEASURES
        .into_iter()
        .map(|part| words::head(Field::Run(Run::Behind, part)))
        .collect();
    assert_distinct(&of_runs);
}

#[test]
fn every_choice_has_words_of_its_own() {
    let choices: Vec<&str> = Choice::ALL
        .iter()
        .map(|choice| words::choice(*choice))
        .collect();
    assert_distinct(&choices);
}

#[test]
fn every_unit_but_one_has_a_symbol_of_its_own_within_its_kind() {
    for kind in kinds() {
        let symbols: Vec<&str> = Unit::ALL
            .into_iter()
            .filter(|unit| unit.measures(kind) && *unit != Unit::One)
            .map(words::unit_symbol)
            .collect();
        assert_distinct(&symbols);
    }
    assert_eq!(words::unit_symbol(Unit::One), "");
}

#[test]
fn every_kind_is_shown_in_a_unit_which_measures_it() {
    for kind in kinds() {
        for system in SYSTEMS {
            assert!(words::unit_of(kind, system).measures(kind), "{kind:?}");
            for si in [0.0, 1e-9, 0.4, 12.0, 9_999.0, 10_000.0, 1e9] {
                assert!(words::unit_for_value(kind, si, system).measures(kind));
                assert_clean(&words::amount(Amount::Measured { si, kind }, system));
                assert_clean(&words::bare(Amount::Measured { si, kind }, system));
            }
        }
    }
}

fn kinds() -> [Kind; 21] {
    [
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
    ]
}

#[test]
fn groups_totals_verdicts_grades_and_inks_have_words_of_their_own() {
    assert_distinct(
        &[
            LedgerGroup::Drives,
            LedgerGroup::Reactors,
            LedgerGroup::Devices,
            LedgerGroup::Conductors,
            LedgerGroup::Others,
            LedgerGroup::Sun,
        ]
        .map(words::ledger_group),
    );
    let totals = [
        TotalKind::Heat,
        TotalKind::InsideTemperature,
        TotalKind::Airflow,
        TotalKind::IncomingCurrent,
        TotalKind::MainDevice,
        TotalKind::FaultCurrent,
    ];
    assert_distinct(&totals.map(words::total));
    totals
        .map(words::limit)
        .iter()
        .for_each(|word| assert_clean(word));
    assert_distinct(
        &[
            Verdict::Within,
            Verdict::Beyond,
            Verdict::Unknown,
            Verdict::NoLimit,
        ]
        .map(words::verdict),
    );
    let grades = [Grade::Stop, Grade::Query, Grade::Note];
    assert_eq!(grades.map(words::grade), ["stop", "query", "note"]);
    assert_distinct(&grades.map(words::grade_meaning));
    assert_distinct(&[Ink::Entered, Ink::Assumed, Ink::Worked].map(words::ink));
    assert_distinct(&[Run::Incoming, Run::Ahead, Run::Behind].map(words::run));
    assert_distinct(&ventrail::sheet::MEASURES.map(words::run_field));
}

// Numbers.

#[test]
fn numbers_are_rounded_and_grouped() {
    let three = Rounding::Significant {
        digits: 3,
        most_decimals: 2,
    };
    let rows = [
        (52.0, three, "52"),
        (67.5, three, "67.5"),
        (3.75, three, "3.75"),
        (3.125, three, "3.13"),
        (1203.4, three, "1,203"),
        (9.996, three, "10"),
        (0.004, three, "0.004"),
        (0.0, three, "0"),
        (-0.0, three, "0"),
        (-40.0, Rounding::Decimals(1), "−40"),
        (-0.04, Rounding::Decimals(1), "−0.04"),
        (2.675, Rounding::Decimals(2), "2.68"),
        (0.5, Rounding::Decimals(0), "1"),
        (999.5, Rounding::Decimals(0), "1,000"),
        (1_234_567.25, Rounding::Exact, "1,234,567.25"),
        (1234.5, Rounding::Decimals(1), "1,234.5"),
        (f64::NAN, Rounding::Decimals(1), "–"),
        (f64::INFINITY, three, "–"),
    ];
    for (value, rounding, expected) in rows {
        assert_eq!(number(value, rounding), expected, "{value} by {rounding:?}");
    }
}

#[test]
fn amounts_are_shown_in_the_units_of_the_sheet() {
    let us = |amount: Amount| words::amount(amount, UnitSystem::Us);
    let si = |amount: Amount| words::amount(amount, UnitSystem::Si);
    assert_eq!(us(Current::amperes(67.5).into()), "67.5 A");
    assert_eq!(us(Current::amperes(11_023.0).into()), "11 kA");
    assert_eq!(us(Temperature::celsius(50.0).into()), "122 °F");
    assert_eq!(si(Temperature::celsius(50.0).into()), "50 °C");
    assert_eq!(us(ShaftPower::horsepower(7.5).into()), "7.5 hp");
    assert_eq!(si(ShaftPower::kilowatts(5.5).into()), "5.5 kW");
    assert_eq!(us(Length::feet(310.0).into()), "310 ft");
    assert_eq!(si(Length::metres(94.488).into()), "94.5 m");
    assert_eq!(us(AirFlow::cubic_feet_per_minute(764.4).into()), "764 CFM");
    assert_eq!(
        si(AirFlow::cubic_metres_per_hour(41.26).into()),
        "41.3 m³/h"
    );
    assert_eq!(us(Ratio::per_cent(5.75).into()), "5.75 %");
    assert_eq!(us(WireSize::Awg4.into()), "4 AWG");
    assert_eq!(us(WireSize::Kcmil250.into()), "250 kcmil");
    assert_eq!(us(Amount::Count(1200)), "1,200");
    assert_eq!(
        words::amount_in(Temperature::celsius(40.0).into(), Unit::Fahrenheit),
        "104 °F"
    );
    assert_eq!(
        words::bare(Current::amperes(12_000.0).into(), UnitSystem::Us),
        "12,000"
    );
}

#[test]
fn sizes_sets_and_devices_read_as_the_trade_writes_them() {
    assert_eq!(words::sets(1, WireSize::Awg4), "4 AWG");
    assert_eq!(words::sets(2, WireSize::Awg3Over0), "2 × 3/0 AWG");
    assert_eq!(
        words::device(
            Current::amperes(80.0),
            DeviceType::TimeDelayFuse,
            UnitSystem::Us
        ),
        "80 A time-delay fuse"
    );
    let sizes: Vec<String> = WireSize::ALL.into_iter().map(words::size).collect();
    assert_distinct(&sizes.iter().map(String::as_str).collect::<Vec<_>>());
}

#[test]
fn rounding_never_hides_which_of_two_values_is_larger() {
    let rows = [
        (10_003.0, 10_000.0),
        (10_049.0, 10_000.0),
        (100.4, 100.0),
        (9_999.0, 10_000.0),
    ];
    for (fault, rating) in rows {
        let (fault_text, rating_text) = words::quantities_apart(
            Current::amperes(fault),
            Current::amperes(rating),
            UnitSystem::Us,
        );
        assert_ne!(fault_text, rating_text, "{fault} and {rating}");
    }
}

proptest! {
    #[test]
    fn two_unequal_values_are_never_shown_alike(a in 0.1_f64..100_000.0, relative in 1e-6_f64..0.1) {
        let b = a * (1.0 + relative);
        let (first, second) =
            words::quantities_apart(Current::amperes(a), Current::amperes(b), UnitSystem::Us);
        prop_assert_ne!(first, second);
    }

    #[test]
    fn any_number_is_shown_as_a_number(value in proptest::num::f64::ANY, decimals in 0_usize..6) {
        for text in [
            number(value, Rounding::Decimals(decimals)),
            number(value, Rounding::Significant { digits: 3, most_decimals: decimals }),
            number(value, Rounding::Exact),
        ] {
            prop_assert!(!text.contains("NaN") && !text.contains("inf"), "{text}");
            prop_assert!(!text.is_empty() && !text.ends_with('.'), "{text}");
            if !value.is_finite() {
                prop_assert_eq!(text, "–");
            }
        }
    }

    #[test]
    fn a_value_which_is_not_nought_never_shows_as_nought(value in 1e-12_f64..10.0) {
        let text = number(value, Rounding::Decimals(1));
        prop_assert!(text.contains(|digit: char| ('1'..='9').contains(&digit)), "{}", text);
    }
}

// Entries.

fn measured(number: f64, unit: Unit, text: &str) -> Entry {
    Entry::Measured(Measured {
        number,
        unit,
        text: text.to_owned(),
    })
}

#[test]
fn a_number_typed_in_the_unit_shown_stays_as_typed() {
    let typed = measured(54.0, Unit::Ampere, "54.0");
    assert_eq!(
        words::entry(Field::DriveInput, &typed, UnitSystem::Us),
        "54.0"
    );
    let with_unit = measured(12.3456, Unit::Ampere, "12.3456 A");
    assert_eq!(
        words::entry(Field::DriveInput, &with_unit, UnitSystem::Us),
        "12.3456"
    );
    assert_eq!(
        words::entry_with_unit(Field::DriveInput, &with_unit, UnitSystem::Us),
        "12.3456 A"
    );
}

#[test]
fn a_number_typed_in_another_unit_is_converted() {
    let kilowatts = measured(11.0, Unit::Kilowatt, "11 kW");
    assert_eq!(
        words::entry(Field::MotorPower, &kilowatts, UnitSystem::Us),
        "14.7"
    );
    assert_eq!(
        words::entry_with_unit(Field::MotorPower, &kilowatts, UnitSystem::Us),
        "14.7 hp"
    );
    assert_eq!(
        words::entry(Field::MotorPower, &kilowatts, UnitSystem::Si),
        "11"
    );
    let warm = measured(40.0, Unit::Celsius, "40 C");
    assert_eq!(
        words::entry_with_unit(Field::RoomAmbient, &warm, UnitSystem::Us),
        "104 °F"
    );
}

#[test]
fn other_entries_show_their_words() {
    let types = BTreeSet::from([Choice::ClassCcFuse, Choice::TimeDelayFuse]);
    let rows = [
        (Field::Tag, Entry::Text("P-401".to_owned()), "P-401"),
        (
            Field::Run(Run::Behind, RunField::Sets),
            Entry::Count(2),
            "2",
        ),
        (Field::Cooling, Entry::Choice(Choice::Sealed), "sealed"),
        (
            Field::PermittedTypes,
            Entry::Choices(types),
            "time-delay fuse, Class CC fuse",
        ),
        (
            Field::Run(Run::Behind, RunField::Size),
            Entry::Size(WireSize::Awg3Over0),
            "3/0 AWG",
        ),
    ];
    for (field, entered, expected) in rows {
        for system in SYSTEMS {
            assert_eq!(words::entry(field, &entered, system), expected);
            assert_eq!(words::entry_with_unit(field, &entered, system), expected);
        }
    }
}

#[test]
fn assumed_values_show_in_the_unit_of_their_field() {
    let limit = AssumedValue::Amount(Temperature::celsius(50.0).into());
    assert_eq!(
        words::assumed(Field::InsideLimit, &limit, UnitSystem::Us),
        "122"
    );
    assert_eq!(
        words::assumed_with_unit(Field::InsideLimit, &limit, UnitSystem::Si),
        "50 °C"
    );
    let choice = AssumedValue::Choice(Choice::Copper);
    let metal = Field::Run(Run::Behind, RunField::Metal);
    assert_eq!(
        words::assumed_with_unit(metal, &choice, UnitSystem::Us),
        "copper"
    );
    let sets = AssumedValue::Amount(Amount::Count(1));
    let field = Field::Run(Run::Behind, RunField::Sets);
    assert_eq!(words::assumed_with_unit(field, &sets, UnitSystem::Us), "1");
}

#[test]
fn what_several_feeders_have_assumed_stands_on_one_line() {
    let at = |id: u32, choice: Choice| ventrail::assume::Assumption {
        place: Place {
            holder: Holder::Feeder(HolderId(id)),
            field: Field::Run(Run::Behind, RunField::Metal),
        },
        value: AssumedValue::Choice(choice),
    };
    let of_sheet = ventrail::assume::Assumption {
        place: Place {
            holder: Holder::Sheet,
            field: Field::RoomAmbient,
        },
        value: AssumedValue::Amount(Temperature::celsius(40.0).into()),
    };
    let assumptions = [at(1, Choice::Copper), of_sheet, at(2, Choice::Copper)];
    let lines = words::assumption_lines(&assumptions, UnitSystem::Us, |id| format!("P-{}", id.0));
    let [room, metal] = lines.as_slice() else {
        panic!("two lines expected: {lines:?}");
    };
    assert_eq!((room.value.as_str(), room.holders.len()), ("104 °F", 0));
    assert_eq!(metal.value, "copper");
    assert_eq!(metal.holders, ["P-1", "P-2"]);
}

#[test]
fn what_an_answer_is_called_can_be_typed() {
    for field in every_field() {
        let (Shape::Choice(offered) | Shape::Choices(offered)) = spec(field).shape else {
            continue;
        };
        for choice in offered {
            let read = entry::read(field, UnitSystem::Us, words::choice(*choice));
            let expected = match spec(field).shape {
                Shape::Choices(_) => Entry::Choices(BTreeSet::from([*choice])),
                _ => Entry::Choice(*choice),
            };
            assert_eq!(read, Ok(Some(expected)), "{field:?}, {choice:?}");
        }
    }
}

#[test]
fn every_symbol_shown_can_be_typed() {
    for field in every_field() {
        let Shape::Measured { kind, least, most } = spec(field).shape else {
            continue;
        };
        for unit in entry::units_for(kind) {
            let middle = unit.from_si(0.5 * (least + most));
            let text = format!("{middle} {}", words::unit_symbol(unit));
            match entry::read(field, UnitSystem::Us, &text) {
                Ok(Some(Entry::Measured(read))) => assert_eq!(read.unit, unit, "{text}"),
                other => panic!("{field:?} does not take {text:?}: {other:?}"),
            }
        }
    }
}

#[test]
fn the_ends_of_the_range_shown_are_taken() {
    for field in every_field() {
        let Shape::Measured { .. } = spec(field).shape else {
            continue;
        };
        for system in SYSTEMS {
            let range = words::accepted(field, system).replace(',', "");
            let (least, most) = range.split_once(" to ").expect("two ends");
            for end in [least, most] {
                let read = entry::read(field, system, end);
                assert!(
                    matches!(read, Ok(Some(Entry::Measured(_)))),
                    "{field:?} does not take {end:?}: {read:?}"
                );
            }
        }
    }
}

proptest! {
    #[test]
    fn the_text_for_editing_gives_the_entry_again(sheet in any_sheet()) {
        let records = std::iter::once(&sheet.record)
            .chain(sheet.feeders.iter().map(|item| &item.record))
            .chain(sheet.sources.iter().map(|item| &item.record));
        for (field, entered) in records.flat_map(|record| record.iter()) {
            for system in SYSTEMS {
                let shown = words::entry_with_unit(field, entered, system);
                prop_assert!(!shown.contains("NaN"), "{}", shown);
                let Entry::Measured(before) = entered else { continue };
                let text = words::entry_to_edit(field, entered, system);
                match entry::read(field, system, &text) {
                    Ok(Some(Entry::Measured(again))) => {
                        prop_assert!(ventrail::math::agree(again.si(), before.si()), "{}", text);
                    }
                    other => prop_assert!(false, "{:?} from {:?}: {:?}", field, text, other),
                }
            }
        }
    }
}

// Sentences.

#[test]
fn every_field_of_the_sheet_stands_in_the_title_block_or_in_one_sentence() {
    let mut places: Vec<Field> = words::title_block().to_vec();
    for sentence in sentences() {
        places.extend(words::fields(&sentence));
    }
    let mut expected = fields_of(Home::Sheet);
    places.sort();
    expected.sort();
    assert_eq!(places, expected);
    assert!(places.iter().all(|field| home(*field) == Home::Sheet));
}

fn sentences() -> [Vec<Piece>; 4] {
    [
        words::supply_sentence(),
        words::incoming_sentence(),
        words::main_sentence(),
        words::enclosure_sentence(),
    ]
}

#[test]
fn sentences_read_well_when_nothing_is_entered() {
    for sentence in sentences() {
        let text: String = sentence
            .iter()
            .map(|piece| match piece {
                Piece::Text(text) => (*text).to_owned(),
                Piece::Field(field) => words::gap(*field).to_owned(),
            })
            .collect();
        assert_sentence(&text);
    }
}

#[test]
fn values_bend_to_their_sentence() {
    let sets = Field::Run(Run::Incoming, RunField::Sets);
    let carrying = Field::Run(Run::Incoming, RunField::Carrying);
    let rows = [
        (sets, "1", "one set of"),
        (sets, "2", "two sets of"),
        (carrying, "3", "three current-carrying conductors"),
        (carrying, "24", "24 current-carrying conductors"),
        (
            Field::Capacitors,
            "no",
            "no switched power-factor capacitors",
        ),
        (Field::Surges, "yes", "prone to surges"),
        (
            Field::MainType,
            "inverse time breaker",
            "an inverse time breaker",
        ),
        (Field::SupplyVoltage, "480 V", "480 V"),
    ];
    for (field, text, expected) in rows {
        assert_eq!(words::in_sentence(field, text), expected);
    }
    assert_eq!(
        words::entry_in_sentence(sets, &Entry::Count(2), UnitSystem::Us),
        "two sets of"
    );
    assert_eq!(
        words::assumed_in_sentence(
            Field::Capacitors,
            &AssumedValue::Choice(Choice::No),
            UnitSystem::Us
        ),
        "no switched power-factor capacitors"
    );
}

// Margin notes and cautions.

/// One note of every kind.
fn every_note() -> Vec<NoteKind> {
    let amperes = Current::amperes;
    let celsius = Temperature::celsius;
    let tags = || vec!["P-401".to_owned(), "P-402".to_owned(), "F-433".to_owned()];
    let reasons = vec![
        ReactorReason::SourcePower,
        ReactorReason::SourceImpedance,
        ReactorReason::Unbalance,
        ReactorReason::Capacitors,
        ReactorReason::Surges,
    ];
    vec![
        NoteKind::DraftRefused {
            text: "4o A".to_owned(),
        },
        NoteKind::TagRepeated {
            tag: "P-401".to_owned(),
        },
        NoteKind::NoLoad,
        NoteKind::SupplyVoltageUnserved {
            voltage: Voltage::volts(400.0),
        },
        NoteKind::MotorNotInTable {
            power: ShaftPower::horsepower(600.0),
        },
        NoteKind::MotorBetweenRows {
            power: ShaftPower::horsepower(35.0),
            row: ShaftPower::horsepower(40.0),
        },
        NoteKind::DriveInputAssumed {
            assumed: amperes(41.2),
        },
        NoteKind::DriveInputUnknown,
        NoteKind::DriveSmallerThanMotor {
            input: amperes(40.0),
            motor: amperes(52.0),
        },
        NoteKind::NoConductorFits {
            run: Run::Behind,
            needed: amperes(900.0),
            carries: amperes(545.0),
            largest: WireSize::Kcmil1000,
        },
        NoteKind::AmbientBeyondInsulation {
            run: Run::Behind,
            ambient: celsius(62.0),
        },
        NoteKind::AluminiumInside { run: Run::Ahead },
        NoteKind::ConductorTooSmall {
            run: Run::Ahead,
            entered: WireSize::Awg8,
            smallest: WireSize::Awg4,
        },
        NoteKind::ParallelTooSmall {
            run: Run::Incoming,
            entered: WireSize::Awg1,
        },
        NoteKind::SizeNotInTable {
            run: Run::Ahead,
            entered: WireSize::Awg16,
        },
        NoteKind::SizeAtHundredPerCent {
            run: Run::Behind,
            size: WireSize::Awg6,
            taken: WireSize::Awg4,
        },
        NoteKind::InsideAirDecides {
            run: Run::Ahead,
            air: celsius(55.0),
        },
        NoteKind::DeviceTypeNotPermitted {
            by_rule: amperes(80.0),
        },
        NoteKind::LimitNotStandard {
            limit: amperes(65.0),
            taken: amperes(60.0),
        },
        NoteKind::LimitBelowStandard {
            limit: amperes(8.0),
        },
        NoteKind::DeviceHeldByDrive {
            by_rule: amperes(100.0),
            taken: amperes(80.0),
        },
        NoteKind::ClassCcEnds {
            by_rule: amperes(45.0),
            taken: amperes(30.0),
        },
        NoteKind::ClassCcTooSmall {
            needed: amperes(42.0),
        },
        NoteKind::DeviceBeyondTable {
            product: amperes(7_000.0),
        },
        NoteKind::DeviceAboveMaximum {
            entered: amperes(100.0),
            largest: amperes(80.0),
        },
        NoteKind::DeviceNotStandard {
            entered: amperes(65.0),
        },
        NoteKind::DeviceBelowInput {
            rating: amperes(50.0),
            input: amperes(54.0),
        },
        NoteKind::DropUnknown {
            run: Run::Behind,
            size: WireSize::Kcmil700,
        },
        NoteKind::DropAboveAdvice {
            drop: Ratio::per_cent(3.4),
            advised: Ratio::per_cent(3.0),
        },
        NoteKind::GroundingCapped {
            run: Run::Ahead,
            size: WireSize::Awg12,
        },
        NoteKind::GroundingBeyondTable {
            rating: amperes(6_000.0),
        },
        NoteKind::ReactorAdvised {
            percent: Ratio::per_cent(3.0),
            reasons: reasons.clone(),
        },
        NoteKind::ReactorBelowAdvice {
            entered: Ratio::per_cent(1.5),
            advised: Ratio::per_cent(3.0),
            reasons,
        },
        NoteKind::SeveralDrives { drives: 11 },
        NoteKind::ReactorReferenceMissing,
        NoteKind::DriveTooHot {
            air: celsius(48.0),
            limit: celsius(40.0),
        },
        NoteKind::DriveTooHigh {
            altitude: Length::metres(1_900.0),
            limit: Length::metres(1_000.0),
        },
        NoteKind::DeviceLossUnknown {
            rating: amperes(400.0),
        },
        NoteKind::SourceHeatUnknown,
        NoteKind::TableFromMemory {
            table: MemoryTable::InsideAmpacity,
            rows: vec!["4 AWG".to_owned(), "6 AWG".to_owned()],
        },
        NoteKind::TableFromMemory {
            table: MemoryTable::FieldAmpacity,
            rows: vec!["1500".to_owned()],
        },
        NoteKind::TableFromMemory {
            table: MemoryTable::FaultConstants,
            rows: vec!["10".to_owned()],
        },
        NoteKind::TableFromMemory {
            table: MemoryTable::BreakerLoss,
            rows: vec!["30".to_owned()],
        },
        NoteKind::TableFromMemory {
            table: MemoryTable::FuseLoss,
            rows: vec!["60".to_owned()],
        },
        NoteKind::StandingBy { tags: tags() },
        NoteKind::ImpedanceAssumed {
            assumed: Ratio::per_cent(5.75),
        },
        NoteKind::SupplyVoltageMissing,
        NoteKind::FaultCurrentUnknown,
        NoteKind::FaultRunUnknown,
        NoteKind::FaultConstantMissing {
            size: WireSize::Kcmil2000,
        },
        NoteKind::FaultAboveRating {
            fault: amperes(10_012.0),
            rating: amperes(10_000.0),
            lowest: tags(),
        },
        NoteKind::RatingMissing {
            tags: tags(),
            main_too: true,
        },
        NoteKind::NoBranchForMain,
        NoteKind::StandbyLarger { tags: tags() },
        NoteKind::WallRuleNearLimit {
            inside: celsius(47.0),
            limit: celsius(50.0),
        },
        NoteKind::OtherLoadsAtCurrent { names: tags() },
        NoteKind::NoCellInColumn {
            run: Run::Ahead,
            column: celsius(60.0),
        },
        NoteKind::LengthMissing { run: Run::Behind },
        NoteKind::SourceUnknown,
        NoteKind::ReactorLossUnused,
        NoteKind::NoMainFits { sum: amperes(8.0) },
        NoteKind::MainBelowRunning {
            rating: amperes(250.0),
            running: amperes(268.0),
        },
        NoteKind::MainAboveMaximum {
            entered: amperes(400.0),
            largest: amperes(350.0),
        },
        NoteKind::MainIncomplete { tags: tags() },
        NoteKind::EnclosureUnknown,
        NoteKind::SunMissing,
        NoteKind::InsideAboveLimit {
            inside: celsius(61.0),
            limit: celsius(50.0),
        },
        NoteKind::InsideNotWarmer {
            limit: celsius(40.0),
            ambient: celsius(40.0),
        },
        NoteKind::AirflowShort {
            installed: AirFlow::cubic_feet_per_minute(583.0),
            needed: AirFlow::cubic_feet_per_minute(764.0),
        },
        NoteKind::AirflowUnknown {
            needed: AirFlow::cubic_feet_per_minute(764.0),
        },
        NoteKind::LedgerIncomplete {
            tags: vec!["P-402".to_owned()],
        },
        NoteKind::LoopKeptWarmerEnd { air: celsius(47.0) },
    ]
}

/// The names of all kinds, as the source lists them: an enum cannot be counted.
fn ids_of_all_kinds() -> BTreeSet<&'static str> {
    include_str!("../src/working/notes.rs")
        .lines()
        .filter(|line| {
            let line = line.trim_start();
            line.starts_with("NoteKind::") || line.starts_with("MemoryTable::")
        })
        .filter_map(|line| line.split('"').nth(1))
        .collect()
}

#[test]
fn the_samples_hold_a_note_of_every_kind() {
    let samples = every_note();
    let ids: BTreeSet<&str> = samples.iter().map(NoteKind::id).collect();
    assert_eq!(ids, ids_of_all_kinds());
}

#[test]
fn every_note_says_what_why_and_what_to_do() {
    for kind in every_note() {
        let note = MarginNote::new(Grade::Query, Field::RoomAmbient, kind);
        for system in SYSTEMS {
            assert_note(&note, system);
        }
    }
}

#[track_caller]
fn assert_note(note: &MarginNote, system: UnitSystem) {
    let said = words::note(note, system);
    for sentence in [&said.what, &said.why, &said.remedy] {
        assert_sentence(sentence);
    }
}

#[test]
fn notes_of_different_kinds_say_different_things() {
    let said: Vec<String> = every_note()
        .into_iter()
        .map(|kind| {
            let note = MarginNote::new(Grade::Query, Field::RoomAmbient, kind);
            words::note(&note, UnitSystem::Us).what
        })
        .collect();
    assert_distinct(&said.iter().map(String::as_str).collect::<Vec<_>>());
}

#[test]
fn a_note_shows_numbers_in_the_units_of_the_sheet() {
    let note = MarginNote::new(
        Grade::Stop,
        Field::InsideLimit,
        NoteKind::InsideAboveLimit {
            inside: Temperature::celsius(61.0),
            limit: Temperature::celsius(50.0),
        },
    );
    assert_eq!(
        words::note(&note, UnitSystem::Us).what,
        "The air inside reaches 141.8 °F, above its limit of 122 °F."
    );
    assert_eq!(
        words::note(&note, UnitSystem::Si).what,
        "The air inside reaches 61 °C, above its limit of 50 °C."
    );
}

#[test]
fn a_fault_current_barely_above_its_rating_does_not_look_equal_to_it() {
    let note = MarginNote::new(
        Grade::Stop,
        Field::MainShortCircuitRating,
        NoteKind::FaultAboveRating {
            fault: Current::amperes(10_012.0),
            rating: Current::amperes(10_000.0),
            lowest: vec!["P-402".to_owned()],
        },
    );
    let why = words::note(&note, UnitSystem::Us).why;
    assert!(
        why.starts_with("10.01 kA can flow; the lowest rating inside is 10 kA"),
        "{why}"
    );
}

#[test]
fn empty_lists_leave_notes_whole() {
    let kinds = [
        NoteKind::StandingBy { tags: Vec::new() },
        NoteKind::TableFromMemory {
            table: MemoryTable::FuseLoss,
            rows: Vec::new(),
        },
        NoteKind::RatingMissing {
            tags: Vec::new(),
            main_too: false,
        },
        NoteKind::RatingMissing {
            tags: Vec::new(),
            main_too: true,
        },
        NoteKind::LedgerIncomplete { tags: Vec::new() },
        NoteKind::MainIncomplete { tags: Vec::new() },
        NoteKind::ReactorAdvised {
            percent: Ratio::per_cent(3.0),
            reasons: Vec::new(),
        },
        NoteKind::FaultAboveRating {
            fault: Current::amperes(11_000.0),
            rating: Current::amperes(10_000.0),
            lowest: Vec::new(),
        },
        NoteKind::DraftRefused {
            text: "x\n".repeat(500),
        },
    ];
    for kind in kinds {
        assert_note(
            &MarginNote::new(Grade::Query, Field::Tag, kind),
            UnitSystem::Us,
        );
    }
}

#[test]
fn a_place_names_its_feeder_and_its_subject() {
    let tag = |_: HolderId| "P-402".to_owned();
    let at = |holder, field| words::place(&Place { holder, field }, tag);
    let feeder = Holder::Feeder(HolderId(7));
    assert_eq!(
        at(feeder, Field::Run(Run::Ahead, RunField::Size)),
        "P-402, conductors ahead of the drive"
    );
    assert_eq!(
        at(feeder, Field::DriveInput),
        "P-402, drive rated input current"
    );
    assert_eq!(
        at(Holder::Sheet, Field::InsideLimit),
        "Warmest air allowed inside"
    );
    assert_eq!(
        at(Holder::Sheet, Field::Run(Run::Incoming, RunField::Length)),
        "Incoming conductors"
    );
    let in_full = |holder, field| words::place_in_full(&Place { holder, field }, tag);
    assert_eq!(
        in_full(feeder, Field::Run(Run::Ahead, RunField::Length)),
        "P-402, ahead of the drive, length one way"
    );
    assert_eq!(
        in_full(Holder::Sheet, Field::Altitude),
        "Height above sea level"
    );
}

#[test]
fn every_caution_has_a_heading_and_defers_in_full_sentences() {
    let said = Caution::ALL.map(words::caution);
    assert_distinct(&said.map(|caution| caution.heading));
    for caution in said {
        assert_sentence(caution.text);
    }
    assert_sentence(words::caution_line());
    assert!(
        said.iter()
            .any(|caution| caution.text.contains("licensed engineer"))
    );
    assert!(
        said.iter()
            .any(|caution| caution.text.contains("prove it dead"))
    );
}

// Refusals.

#[test]
fn every_entry_refusal_says_what_is_wrong_and_what_would_be_taken() {
    use entry::Refusal;
    let text = || "4o".to_owned();
    let refusals = [
        Refusal::NotANumber { text: text() },
        Refusal::TwoReadings {
            text: "3,900".to_owned(),
            readings: [3900.0, 3.9],
            unit: Unit::Foot,
        },
        Refusal::UnknownUnit {
            unit: "furlong".to_owned(),
            fits: entry::units_for(Kind::Length),
        },
        Refusal::WrongUnit {
            unit: "kV".to_owned(),
            fits: entry::units_for(Kind::Current),
        },
        Refusal::OutOfRange {
            text: text(),
            least: Unit::Celsius.to_si(-40.0),
            most: Unit::Celsius.to_si(70.0),
            unit: Unit::Fahrenheit,
        },
        Refusal::NotWhole {
            text: text(),
            least: 1,
            most: 12,
        },
        Refusal::CountOutOfRange {
            text: text(),
            least: 1,
            most: 12,
        },
        Refusal::NotOffered {
            text: text(),
            offered: &[Choice::Copper, Choice::Aluminium],
        },
        Refusal::SeveralFit {
            text: text(),
            fitting: vec![Choice::Marked60, Choice::Marked75],
        },
        Refusal::UnknownSize {
            text: text(),
            smaller: Some(WireSize::Awg6),
            larger: Some(WireSize::Awg4),
        },
        Refusal::UnknownSize {
            text: text(),
            smaller: Some(WireSize::Kcmil2000),
            larger: None,
        },
        Refusal::UnknownSize {
            text: text(),
            smaller: None,
            larger: Some(WireSize::Awg18),
        },
        Refusal::UnknownSize {
            text: text(),
            smaller: None,
            larger: None,
        },
        Refusal::MetricSize {
            text: text(),
            larger: Some(WireSize::Awg1),
        },
        Refusal::MetricSize {
            text: text(),
            larger: None,
        },
        Refusal::TooLong {
            length: 2_100,
            most: 2_000,
        },
        Refusal::ControlCharacter {
            text: "P-401\tpump".to_owned(),
        },
    ];
    for refusal in &refusals {
        let said = words::entry_refusal(refusal);
        assert_sentence(&said);
        assert!(said.contains(". "), "no remedy in {said:?}");
    }
    assert_eq!(
        words::entry_refusal(&refusals[1]),
        "“3,900” may mean 3,900 ft or 3.9 ft. Type it without marks between thousands: 3900 or 3.9."
    );
    assert_eq!(
        words::entry_refusal(&refusals[4]),
        "“4o” is outside the range. Type a value from −40 °F to 158 °F."
    );
}

#[test]
fn every_file_refusal_names_the_trouble_and_a_way_out() {
    use file::{Damage, Expected, Fault, Refusal};
    let faults = [
        Fault::Missing,
        Fault::UnknownName,
        Fault::Repeated,
        Fault::WrongType {
            expected: Expected::Text,
        },
        Fault::WrongType {
            expected: Expected::Number,
        },
        Fault::WrongType {
            expected: Expected::WholeNumber,
        },
        Fault::WrongType {
            expected: Expected::List,
        },
        Fault::WrongType {
            expected: Expected::Object,
        },
        Fault::UnknownUnit {
            found: "furlong".to_owned(),
        },
        Fault::WrongUnit {
            found: "V".to_owned(),
        },
        Fault::UnknownChoice {
            found: "gold".to_owned(),
        },
        Fault::UnknownSize {
            found: "5".to_owned(),
        },
        Fault::WrongHolder,
        Fault::TwoHolders,
        Fault::NoSuchHolder { id: 7 },
        Fault::IdTwice { id: 7 },
        Fault::IdNotGivenOut { id: 7, next: 3 },
        Fault::TooLargeNumber { most: 12 },
        Fault::TooMany { most: 2_000 },
        Fault::TooLong { most: 60 },
        Fault::Impossible(Impossible::WrongShape),
        Fault::Impossible(Impossible::NotFinite),
        Fault::Impossible(Impossible::OutOfRange {
            least: 0.0,
            most: 1.0,
        }),
        Fault::Impossible(Impossible::TooLong { most: 60 }),
        Fault::Impossible(Impossible::Empty),
        Fault::Impossible(Impossible::NotOffered),
    ];
    let damaged = faults.map(|fault| {
        Refusal::Damaged(Damage {
            path: "feeders[3].drive_input".to_owned(),
            fault,
        })
    });
    for refusal in &damaged {
        let said = words::file_refusal(refusal);
        assert!(said.contains("feeders[3].drive_input"), "{said}");
        assert_sentence(&said);
    }
    for refusal in [
        Refusal::TooLarge {
            bytes: 99_999_999,
            most: 16_777_216,
        },
        Refusal::NotJson {
            line: 12,
            column: 7,
        },
        Refusal::TooManyValues { most: 2_000_000 },
        Refusal::NotASheet,
        Refusal::NewerFormat {
            format: 9,
            newest: 1,
        },
    ] {
        assert_sentence(&words::file_refusal(&refusal));
    }
}

// Workings.

#[test]
fn every_rule_has_a_title_of_its_own() {
    let titles: Vec<&str> = rules::all()
        .into_iter()
        .inspect(|rule| {
            assert_ne!(
                words::rule_title(rule),
                rule.gives,
                "{} has no title",
                rule.id
            );
        })
        .map(words::rule_title)
        .collect();
    assert_distinct(&titles);
}

#[test]
fn every_symbol_of_a_formula_is_explained() {
    for rule in rules::all() {
        if let Form::Formula { symbols, .. } = rule.form {
            for symbol in symbols {
                let meaning = words::symbol_for(symbol, None);
                assert!(
                    !meaning.is_empty(),
                    "{symbol} of {} is not explained",
                    rule.id
                );
            }
        }
    }
}

#[test]
fn a_formula_is_shown_with_its_numbers_and_its_clause() {
    let figure = rules::INPUT_AMPACITY.figure(
        Current::amperes(67.5),
        [
            ventrail::working::Given::entered(Field::DriveInput, Current::amperes(54.0))
                .term("I_in"),
        ],
    );
    let chain = words::working(&figure, UnitSystem::Us);
    let [line] = chain.as_slice() else {
        panic!("one step expected: {chain:?}");
    };
    assert_eq!(line.formula, "I_z = 1.25 × I_in");
    assert_eq!(line.numbers, "1.25 × 54 A = 67.5 A");
    assert_eq!(line.result, "67.5 A");
    assert_eq!(line.source, "NEC 2023, 430.122(A)");
    assert_eq!(line.note, "");
    assert_eq!(line.terms[0].origin, "entered: drive rated input current");
    assert_eq!(line.terms[0].ink, Some(Ink::Entered));
    assert_eq!(
        words::working_flat(&figure, UnitSystem::Us),
        "I_z = 1.25 × I_in = 1.25 × 54 A = 67.5 A (NEC 2023, 430.122(A))"
    );
}

#[test]
fn roots_squares_and_greek_letters_are_shown_as_such() {
    let volts = Term::constant("U", Voltage::volts(480.0));
    let power = rules::DRIVE_APPARENT_POWER.figure(
        Voltage::volts(480.0) * Current::amperes(54.0),
        [volts, Term::constant("I_in", Current::amperes(54.0))],
    );
    assert_eq!(
        words::working_line(&power, UnitSystem::Us).formula,
        "S_d = √3 × U × I_in"
    );
    let shown = |rule: &'static ventrail::working::Rule| {
        words::working_line(&rule.figure(Ratio::of_one(1.0), Vec::new()), UnitSystem::Us).formula
    };
    assert_eq!(shown(&rules::RUN_HEAT), "P = 3 × I² × R × L / n");
    assert_eq!(shown(&rules::REACTIVE_FACTOR), "sin φ = √(1 − (cos φ)²)");
    assert_eq!(
        shown(&rules::DEVICE_HEAT_ASSUMED),
        "P = n × P_n × (I / I_n)²"
    );
    assert_eq!(
        shown(&rules::DRIVE_INPUT_ASSUMED),
        "I_in = P / (η_m × η_d × √3 × U × λ)"
    );
    assert_eq!(
        shown(&rules::REACTOR_INDUCTANCE),
        "L = z × U / (√3 × 2 × π × f × I_r)"
    );
    assert_eq!(
        shown(&rules::SITE_PRESSURE),
        "p = 101,325 × (1 − 0.0000225577 × z)^5.25588"
    );
}

#[test]
fn sources_carry_their_year() {
    use ventrail::working::sources;
    assert_eq!(words::source_name(&sources::NEC), "NEC 2023");
    assert_eq!(
        words::source_name(&sources::IEC_60898_1),
        "IEC 60898-1:2015"
    );
    assert_eq!(words::source_name(&sources::UL_508A), "UL 508A");
    assert_clean(&words::source_in_full(&sources::UL_508A));
    assert_clean(&words::source_in_full(&sources::PHYSICS));
}

#[test]
fn a_rule_known_from_memory_says_so() {
    let figure = rules::DISCONNECT.figure(Current::amperes(62.1), Vec::new());
    assert_eq!(
        words::working_line(&figure, UnitSystem::Us).note,
        "from memory: confirm"
    );
}

#[test]
fn heat_formulas_are_worked_in_si_and_end_in_the_units_of_the_sheet() {
    use ventrail::quantity::{HeatConductance, Power, TemperatureDifference};
    let figure = rules::SEALED_RISE.figure(
        TemperatureDifference::kelvin(20.0),
        [
            Term::constant("P", Power::watts(800.0)),
            Term::constant("G", HeatConductance::watts_per_kelvin(40.0)),
        ],
    );
    assert_eq!(
        words::working_line(&figure, UnitSystem::Us).numbers,
        "800 W / 40 W/K = 20 K = 36 °F"
    );
    assert_eq!(
        words::working_line(&figure, UnitSystem::Si).numbers,
        "800 W / 40 W/K = 20 K"
    );
}

#[test]
fn a_chain_tells_each_step_once() {
    let cell = Arc::new(rules::INSIDE_CELL.figure(
        Current::amperes(85.0),
        [
            Term::constant("size", WireSize::Awg4),
            Term::constant("column", Temperature::celsius(75.0)),
        ],
    ));
    let usable = rules::USABLE_AMPACITY.figure(
        Current::amperes(85.0),
        [Term::of("I_T", &cell), Term::of("I_C", &cell)],
    );
    let chain = words::working(&usable, UnitSystem::Us);
    assert_eq!(chain.len(), 2);
    assert_eq!(chain[1].numbers, "size 4 AWG, column 75 °C: 85 A");
    assert_eq!(chain[1].source, "UL 508A, Table 28.1, 29.6");
}

fn figures_of(worked: &Worked) -> Vec<Arc<Figure>> {
    let mut figures = Vec::new();
    for feeder in &worked.feeders {
        for run in [&feeder.ahead, &feeder.behind].into_iter().flatten() {
            figures.push(Arc::clone(&run.required));
            figures.extend(
                [
                    &run.size,
                    &run.ampacity,
                    &run.drop_ratio,
                    &run.grounding,
                    &run.heat,
                ]
                .into_iter()
                .flatten()
                .cloned(),
            );
        }
        figures.extend(feeder.drop_ratio.clone());
        figures.extend(feeder.disconnect.clone());
        figures.extend(feeder.heat.total.clone());
        for device in feeder.device.iter() {
            figures.extend(device.largest.clone());
        }
        for reactor in [&feeder.reactor.entered, &feeder.reactor.advised]
            .into_iter()
            .flatten()
        {
            figures.push(Arc::clone(&reactor.inductance));
        }
    }
    figures.push(Arc::clone(&worked.ledger.running));
    figures.extend(worked.incoming.running.clone());
    for air in [&worked.enclosure.air, &worked.enclosure.air_connected] {
        figures.extend(
            [
                &air.sealed_inside,
                &air.airflow,
                &air.airflow_credited,
                &air.airflow_metric_rule,
                &air.airflow_us_rule,
            ]
            .into_iter()
            .flatten()
            .cloned(),
        );
    }
    figures.extend(
        worked
            .totals
            .iter()
            .filter_map(|total| total.figure.clone()),
    );
    figures
}

/// The sheet without the person's own names, which may hold anything and stand in workings as they are.
fn without_names(mut sheet: ventrail::sheet::Sheet) -> ventrail::sheet::Sheet {
    for item in sheet.feeders.iter_mut().chain(&mut sheet.sources) {
        let record = &mut std::sync::Arc::make_mut(item).record;
        record.clear(Field::Tag);
        record.clear(Field::SourceName);
    }
    sheet
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    #[test]
    fn whatever_is_worked_can_be_told(sheet in prop_oneof![any_sheet(), ordinary_sheet()]) {
        let worked = work_out(&without_names(sheet));
        for system in SYSTEMS {
            for note in &worked.notes {
                // Tags are the person's own words; they may hold anything.
                let said = words::note(note, system);
                for part in [said.what, said.why, said.remedy] {
                    prop_assert!(!part.is_empty() && !part.contains("NaN"), "{}", part);
                }
                words::place(&note.place, |_| "P-1".to_owned());
            }
            for figure in figures_of(&worked) {
                for line in words::working(&figure, system) {
                    for text in [&line.title, &line.formula, &line.numbers, &line.result, &line.source] {
                        assert_clean(text);
                    }
                    for term in &line.terms {
                        assert_clean(&term.symbol);
                        assert_clean(&term.value);
                        assert_clean(&term.origin);
                    }
                }
                assert_clean(&words::working_flat(&figure, system));
            }
            for feeder in &worked.feeders {
                for run in [&feeder.ahead, &feeder.behind].into_iter().flatten() {
                    assert_sentence(&words::size_found(run, system));
                    prop_assert_eq!(words::installed(run).is_some(), run.installed().is_some());
                }
                let device = feeder.device.as_ref();
                if let Some(text) = device.and_then(|device| words::branch_device(device, system)) {
                    assert_clean(&text);
                }
            }
            for total in &worked.totals {
                let said = words::total_words(total, system);
                if total.verdict == Verdict::Beyond {
                    prop_assert_ne!(&said.running, &said.limit);
                }
                for text in [said.running, said.connected, said.limit].iter().flatten() {
                    assert_clean(text);
                }
            }
            for assumption in &worked.assumptions {
                let field = assumption.place.field;
                assert_clean(&words::assumed_with_unit(field, &assumption.value, system));
                let reason = words::assumption_reason(field);
                prop_assert_ne!(reason, "filled in until it is typed", "{:?}", field);
            }
        }
    }
}

// Fixed texts.

#[test]
fn fixed_texts_are_clean() {
    for (name, text) in page::ALL {
        assert!(!text.trim().is_empty(), "{name} is empty");
        assert_eq!(*text, text.trim(), "{name}");
        assert!(!text.contains("  ") && !text.contains('{'), "{name}");
    }
    for (keys, what) in page::grid_keys().iter().chain(page::page_keys()) {
        assert_clean(keys);
        assert_clean(what);
    }
}

#[test]
fn counts_read_as_people_say_them() {
    let standing_by =
        |tags: &[&str]| -> Vec<String> { tags.iter().map(|tag| (*tag).to_owned()).collect() };
    assert_eq!(page::grade_counts(1, 3, 1), "1 stop, 3 queries, 1 note");
    assert_eq!(page::grade_counts(0, 1, 0), "1 query");
    assert_eq!(page::grade_counts(0, 0, 0), page::no_notes());
    assert_eq!(page::feeder_counts(1, &[]), "1 feeder");
    assert_eq!(
        page::feeder_counts(11, &standing_by(&["P-403", "F-433"])),
        "11 feeders, 9 run together (P-403 and F-433 stand by)"
    );
    assert_eq!(
        page::feeder_counts(3, &standing_by(&["P-403"])),
        "3 feeders, 2 run together (P-403 stands by)"
    );
}

#[test]
fn edits_are_named_for_undo() {
    use ventrail::sheet::{Edit, NoteRef};
    let tag = |_: HolderId| "P-402".to_owned();
    let id = HolderId(7);
    let place = Place {
        holder: Holder::Feeder(id),
        field: Field::DriveInput,
    };
    let note = NoteRef {
        place,
        kind: "no-load".to_owned(),
    };
    let named = |edit: Edit| page::edit_name(&edit, tag);
    assert_eq!(
        named(Edit::Set(place, Entry::Count(1))),
        "drive rated input current of P-402"
    );
    assert_eq!(named(Edit::MoveFeeder { id, up: true }), "move P-402 up");
    let names = [
        named(Edit::Clear(place)),
        named(Edit::Refuse(place, "x".to_owned())),
        named(Edit::AddFeeder { after: None }),
        named(Edit::DuplicateFeeder(id)),
        named(Edit::DeleteFeeder(id)),
        named(Edit::MoveFeeder { id, up: false }),
        named(Edit::AddSource),
        named(Edit::Answer(note, "yes".to_owned())),
        named(Edit::Replace(Box::default())),
    ];
    assert_distinct(&names.iter().map(String::as_str).collect::<Vec<_>>());
    assert_clean(&named(Edit::DeleteSource(id)));
}
