//! What the program does where the rules leave a choice: each reading is a claim, with numbers worked by hand.
//!
//! The sheets are small panels at 480 V. Table cells stand in the comments with the table they are from; hand-worked
//! numbers carry six digits. Clauses are those of NEC 2023.

#![allow(
    clippy::expect_used,
    clippy::unwrap_used,
    clippy::panic,
    clippy::indexing_slicing,
    reason = "helpers of tests stop at the first surprise"
)]

use std::collections::BTreeSet;
use std::sync::Arc;
use ventrail::assume::AssumedValue;
use ventrail::quantity::{
    CrossSection, Current, Frequency, Inductance, Length, Ratio, Temperature, Unit, Voltage,
    WireSize,
};
use ventrail::sheet::{Choice, Entry, Item, Measured, Record, Sheet};
use ventrail::sizing::conductor::{
    ConductorChoice, Conductors, DecidedBy, RunInput, Surrounding, Terminal, demand_of, size_run,
};
use ventrail::sizing::rules;
use ventrail::tables::{Column, Conduit, Metal};
use ventrail::work::{LedgerGroup, TotalKind, Verdict, Worked, WorkedFeeder, work_out};
use ventrail::working::{
    Amount, Field, Figure, Given, Grade, Holder, HolderId, Ink, MarginNote, MemoryTable, NoteKind,
    Origin, ReactorReason, Run, RunField,
};

// --- currents -------------------------------------------------------------------------------------------------------

#[test]
fn a_motor_between_two_rows_takes_the_next_row_up_and_says_so() {
    // Table 430.250 at 460 V: 10 hp 14 A, 15 hp 21 A. 480 V is served by the 460 V column, unscaled.
    let between = feeder(&[(Field::MotorPower, horsepower(12.0))]);
    assert_amperes(&between.motor_current, 21.0);
    let note = only_note(&between.notes, "motor-between-rows");
    assert_eq!(note.grade, Grade::Note);
    // 11 kW is 11 / 0.746 = 14.745 hp: the 15 hp row too.
    let metric = feeder(&[(Field::MotorPower, measured(11.0, Unit::Kilowatt))]);
    assert_amperes(&metric.motor_current, 21.0);
    let exact = feeder(&[(Field::MotorPower, horsepower(10.0))]);
    assert_amperes(&exact.motor_current, 14.0);
    assert_no_note(&exact.notes, "motor-between-rows");
}

#[test]
fn a_motor_current_which_is_entered_stands_before_the_table() {
    // 430.6(A): low speed, high torque and multispeed motors go by their nameplate. 1.25 x 16.5 A = 20.625 A.
    let slow = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::MotorCurrent, amperes(16.5)),
    ]);
    assert_amperes(&slow.motor_current, 16.5);
    assert_near(si(&slow.behind.as_ref().unwrap().required), 20.625);
    assert_near(si(&slow.device.as_ref().unwrap().product), 1.75 * 16.5);
}

#[test]
fn a_motor_which_the_table_does_not_hold_is_a_stop_and_is_not_sized() {
    // Above 500 hp the table has no row at 460 V, and 380 V is served by no column.
    let huge = feeder(&[(Field::MotorPower, horsepower(600.0))]);
    assert_eq!(
        only_note(&huge.notes, "motor-not-in-table").grade,
        Grade::Stop
    );
    assert!(huge.motor_current.is_none() && huge.behind.is_none() && huge.device.is_none());
    let panel = panel(
        &[(Field::SupplyVoltage, volts(380.0))],
        &[&[(Field::MotorPower, horsepower(10.0))]],
    );
    let foreign = &panel.feeders[0];
    assert_eq!(
        only_note(&foreign.notes, "supply-voltage-unserved").grade,
        Grade::Stop
    );
    assert!(foreign.motor_current.is_none());
}

#[test]
fn an_assumed_drive_input_follows_the_practice_of_small_medium_and_large_motors() {
    // P / (eta_m x 0.97 x sqrt(3) x 480 V x lambda):
    //  3 hp:  2238 W / (0.80 x 0.97 x 831.384 V x 0.45) =  7.70875 A
    // 10 hp:  7460 W / (0.86 x 0.97 x 831.384 V x 0.60) = 17.9273 A
    // 12 hp takes the row of 15 hp: 11190 W / (0.90 x 0.97 x 831.384 V x 0.65) = 23.7192 A
    // 40 hp: 29840 W / (0.90 x 0.97 x 831.384 V x 0.65) = 63.2513 A
    for (power, expected) in [
        (3.0, 7.708_75),
        (10.0, 17.927_3),
        (12.0, 23.719_2),
        (40.0, 63.251_3),
    ] {
        let assumed = feeder(&[(Field::MotorPower, horsepower(power))]);
        assert_amperes(&assumed.drive_input, expected);
        let input = assumed.drive_input.as_ref().unwrap();
        assert_eq!(input.ink(), Ink::Assumed);
        assert_eq!(
            only_note(&assumed.notes, "drive-input-assumed").grade,
            Grade::Query
        );
    }
}

#[test]
fn an_assumed_drive_input_is_never_below_the_motors_current() {
    // With a power factor of 0.88 the products are 3.94, 12.22 and 46.7 A: below 4.8, 14 and 52 A of Table 430.250.
    for (power, motor) in [(3.0, 4.8), (10.0, 14.0), (40.0, 52.0)] {
        let smooth = feeder(&[
            (Field::MotorPower, horsepower(power)),
            (Field::DriveChoke, per_cent(5.0)),
        ]);
        assert_amperes(&smooth.drive_input, motor);
        assert_eq!(smooth.drive_input.as_ref().unwrap().ink(), Ink::Assumed);
    }
}

#[test]
fn only_a_choke_or_reactor_of_three_per_cent_which_is_entered_smooths_an_assumed_input() {
    // 10 hp: 17.9273 A without, 14 A (the motor's) with.
    let with = |entries: &[(Field, Entry)]| {
        let mut all = vec![(Field::MotorPower, horsepower(10.0))];
        all.extend_from_slice(entries);
        feeder(&all)
            .drive_input
            .as_ref()
            .unwrap()
            .value
            .to_amperes()
    };
    assert_near(with(&[(Field::DriveChoke, per_cent(2.9))]), 17.927_3);
    assert_near(with(&[(Field::DriveChoke, per_cent(3.0))]), 14.0);
    assert_near(with(&[(Field::ReactorPercent, per_cent(2.9))]), 17.927_3);
    assert_near(with(&[(Field::ReactorPercent, per_cent(3.0))]), 14.0);
    // A bus with switched capacitors has a reactor advised; it smooths nothing before it is entered.
    let advised = panel(
        &[(Field::Capacitors, choice(Choice::Yes))],
        &[&[(Field::MotorPower, horsepower(10.0))]],
    );
    assert!(advised.feeders[0].reactor.advised.is_some());
    assert_amperes(&advised.feeders[0].drive_input, 17.927_3);
}

#[test]
fn an_entered_drive_input_is_taken_as_it_is() {
    let entered = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(13.0)),
    ]);
    assert_amperes(&entered.drive_input, 13.0);
    assert_no_note(&entered.notes, "drive-input-assumed");
    // 13 A is less than the motor's 14 A: is it the right drive?
    assert_eq!(
        only_note(&entered.notes, "drive-smaller-than-motor").grade,
        Grade::Query
    );
}

#[test]
fn a_feeder_without_a_load_is_not_sized() {
    let idle = feeder(&[(Field::Tag, text("P-1"))]);
    assert!(idle.motor_current.is_none() && idle.drive_input.is_none());
    assert!(idle.ahead.is_none() && idle.behind.is_none() && idle.device.is_none());
    assert!(idle.heat.total.is_none());
    assert_eq!(only_note(&idle.notes, "no-load").grade, Grade::Note);
}

// --- conductors -----------------------------------------------------------------------------------------------------

#[test]
fn both_halves_of_the_ampacity_test_must_reach_125_per_cent() {
    // 40 A: 1.25 x 40 = 50 A. Terminals at 75 °C: 8 AWG 50 A would do. Six conductors (0.80) at 40 °C (0.88 for 75 °C
    // insulation) leave 0.704 of Table 310.16: 8 AWG 35.2 A, 6 AWG 45.76 A, 4 AWG 59.84 A.
    let run = field_run(40.0, 6);
    let (sized, notes) = sized(&run, 40.0);
    assert_near(si(&sized.required), 50.0);
    assert_eq!(sized.installed(), Some(WireSize::Awg4));
    assert_near(si(sized.ampacity.as_ref().unwrap()), 59.84);
    let ConductorChoice::Chosen {
        decided_by,
        smaller: Some(smaller),
        ..
    } = &sized.choice
    else {
        panic!("{:?}", sized.choice);
    };
    assert_eq!(*decided_by, DecidedBy::CorrectedColumn);
    assert_eq!(smaller.size, WireSize::Awg6);
    assert_near(si(smaller.ampacity.as_ref().unwrap()), 45.76);
    // With 100 per cent on the corrected half 6 AWG would do: 45.76 A for 40 A, and 65 A at the terminals for 50 A.
    let note = only_note(&notes, "size-at-hundred-per-cent");
    assert_eq!(note.grade, Grade::Note);
    assert_eq!(
        note.kind,
        NoteKind::SizeAtHundredPerCent {
            run: Run::Behind,
            size: WireSize::Awg6,
            taken: WireSize::Awg4,
        }
    );
}

#[test]
fn the_other_reading_is_not_spoken_of_where_it_gives_the_same_size() {
    // Three conductors at 30 °C: both readings end at the terminals, 8 AWG 50 A.
    let (sized, notes) = sized(&field_run(30.0, 3), 40.0);
    assert_eq!(sized.installed(), Some(WireSize::Awg8));
    assert_no_note(&notes, "size-at-hundred-per-cent");
}

#[test]
fn between_two_bands_of_air_the_hotter_one_is_taken() {
    // 8 AWG at 75 °C: 50 A. Up to 35 °C 0.94, from there to 40 °C 0.88, and 40.1 °C is in the band to 45 °C, 0.82.
    for (celsius, expected) in [(35.0, 47.0), (35.1, 44.0), (40.0, 44.0), (40.1, 41.0)] {
        let run = RunInput {
            size: Some(WireSize::Awg8),
            ..field_run(celsius, 3)
        };
        let (sized, _) = sized(&run, 20.0);
        assert_near(si(sized.ampacity.as_ref().unwrap()), expected);
    }
}

#[test]
fn unmarked_terminals_are_read_at_60_degrees_up_to_100_amperes_and_at_75_above() {
    // Inside, UL 508A Table 28.1. 80 A: 100 A are asked for, at 60 °C 2 AWG has 95 and 1 AWG 110.
    // 80.1 A: 100.125 A, at 75 °C 3 AWG has 100 and 2 AWG 115. The larger load has the smaller wire, and rightly so.
    for (input, size) in [(80.0, WireSize::Awg1), (80.1, WireSize::Awg2)] {
        let (sized, _) = sized(&inside_run(None), input);
        assert_eq!(sized.installed(), Some(size), "{input} A");
    }
    // In the field, Table 310.16: the same cells.
    for (current, size) in [(80.0, WireSize::Awg1), (80.1, WireSize::Awg2)] {
        let run = RunInput {
            terminal: entered(Terminal::Unmarked),
            ..field_run(30.0, 3)
        };
        let (sized, _) = sized(&run, current);
        assert_eq!(sized.installed(), Some(size), "{current} A");
    }
}

#[test]
fn marked_terminals_are_read_at_their_mark() {
    // 60 A: 75 A are asked for. Table 28.1 at 60 °C: 4 AWG 70, 3 AWG 85; at 75 °C: 6 AWG 65, 4 AWG 85.
    for (terminal, size) in [
        (Terminal::Marked60, WireSize::Awg3),
        (Terminal::Marked75, WireSize::Awg4),
    ] {
        let run = RunInput {
            terminal: entered(terminal),
            ..inside_run(None)
        };
        let (sized, _) = sized(&run, 60.0);
        assert_eq!(sized.installed(), Some(size), "{terminal:?}");
    }
    // Above 110 A the 60 °C column of Table 28.1 has no cells: marked so, nothing fits.
    let run = RunInput {
        terminal: entered(Terminal::Marked60),
        ..inside_run(None)
    };
    let (sized, notes) = sized(&run, 90.0);
    assert_eq!(sized.installed(), None);
    assert_eq!(only_note(&notes, "no-conductor-fits").grade, Grade::Stop);
}

#[test]
fn wire_inside_of_a_cooler_insulation_than_its_terminals_is_read_by_its_insulation() {
    // 60 A: 75 A are asked for. Terminals marked 75 °C, wire for 60 °C: 4 AWG has 70 A at 60 °C, 3 AWG 85.
    let run = RunInput {
        terminal: entered(Terminal::Marked75),
        insulation: entered(Column::C60),
        ..inside_run(None)
    };
    let (sized, _) = sized(&run, 60.0);
    assert_eq!(sized.installed(), Some(WireSize::Awg3));
    // What is printed as the column is the one which was read.
    let cell = below(
        sized.ampacity.as_ref().unwrap(),
        "sizing.conductor.inside_cell",
    );
    assert_near(si(&cell), 85.0);
    let column = cell.terms.iter().find(|term| term.symbol == "column");
    assert_eq!(
        column.map(|term| term.amount),
        Some(Amount::from(Temperature::celsius(60.0)))
    );
}

#[test]
fn hot_air_inside_tests_the_insulation_besides_the_inside_table() {
    // 31.6 A: 39.5 A are asked for. Table 28.1 at 60 °C: 8 AWG 40 A. Its 90 °C insulation has 55 A in Table 310.16:
    // x 0.76 up to 55 °C = 41.8 A, x 0.71 up to 60 °C = 39.05 A, which is too little. 6 AWG: 75 x 0.71 = 53.25 A.
    let (warm, notes) = sized(&inside_run(Some(55.0)), 31.6);
    assert_eq!(warm.installed(), Some(WireSize::Awg8));
    assert_no_note(&notes, "inside-air-decides");
    let (hot, notes) = sized(&inside_run(Some(60.0)), 31.6);
    assert_eq!(hot.installed(), Some(WireSize::Awg6));
    assert_near(si(hot.ampacity.as_ref().unwrap()), 53.25);
    assert_eq!(only_note(&notes, "inside-air-decides").grade, Grade::Note);
    // Up to 30 °C Table 28.1 stands as printed.
    let (cool, _) = sized(&inside_run(Some(30.0)), 31.6);
    assert_near(si(cool.ampacity.as_ref().unwrap()), 40.0);
}

#[test]
fn insulation_in_air_beyond_its_column_is_a_stop() {
    // Table 310.15(B)(1)(1): 75 °C insulation ends at 70 °C.
    let (hot, notes) = sized(&field_run(70.1, 3), 10.0);
    assert_eq!(hot.choice, ConductorChoice::TooHot);
    assert_eq!(hot.installed(), None);
    assert_eq!(
        only_note(&notes, "ambient-beyond-insulation").grade,
        Grade::Stop
    );
    let (warm, _) = sized(&field_run(70.0, 3), 10.0);
    assert!(warm.installed().is_some());
}

#[test]
fn aluminium_inside_is_a_stop() {
    let run = RunInput {
        metal: entered(Metal::Aluminium),
        ..inside_run(None)
    };
    let (sized, notes) = sized(&run, 20.0);
    assert_eq!(sized.choice, ConductorChoice::NoTable);
    assert_eq!(sized.installed(), None);
    assert_eq!(only_note(&notes, "aluminium-inside").grade, Grade::Stop);
}

#[test]
fn an_aluminium_size_entered_inside_is_not_given_the_ampacity_of_copper() {
    // Table 28.1 is of copper alone: 6 AWG of aluminium has no ampacity there.
    let run = RunInput {
        metal: entered(Metal::Aluminium),
        size: Some(WireSize::Awg6),
        ..inside_run(None)
    };
    let (sized, notes) = sized(&run, 20.0);
    assert_eq!(sized.installed(), Some(WireSize::Awg6));
    assert!(sized.ampacity.is_none(), "{:?}", sized.ampacity);
    assert_eq!(only_note(&notes, "aluminium-inside").grade, Grade::Stop);
}

#[test]
fn aluminium_in_the_field_has_its_own_columns() {
    // 20 A: 25 A at 75 °C: 12 AWG aluminium has 20, 10 AWG 30; copper 12 AWG has 25.
    for (metal, size) in [
        (Metal::Aluminium, WireSize::Awg10),
        (Metal::Copper, WireSize::Awg12),
    ] {
        let run = RunInput {
            metal: entered(metal),
            ..field_run(30.0, 3)
        };
        assert_eq!(sized(&run, 20.0).0.installed(), Some(size), "{metal:?}");
    }
    // The smallest building wire, 310.3(A): 14 AWG of copper, 12 AWG of aluminium.
    for (metal, size) in [
        (Metal::Aluminium, WireSize::Awg12),
        (Metal::Copper, WireSize::Awg14),
    ] {
        let run = RunInput {
            metal: entered(metal),
            ..field_run(30.0, 3)
        };
        let (small, _) = sized(&run, 1.0);
        assert_eq!(small.installed(), Some(size), "{metal:?}");
        assert!(matches!(
            small.choice,
            ConductorChoice::Chosen {
                decided_by: DecidedBy::SmallestWire,
                ..
            }
        ));
    }
}

#[test]
fn conductors_in_parallel_begin_at_1_over_0() {
    // 310.10(G). 100 A in two sets: 62.5 A in each would be 6 AWG.
    let run = RunInput {
        sets: entered(2),
        ..field_run(30.0, 3)
    };
    let (pair, _) = sized(&run, 100.0);
    assert_eq!(pair.installed(), Some(WireSize::Awg1Over0));
    assert!(matches!(
        pair.choice,
        ConductorChoice::Chosen {
            decided_by: DecidedBy::ParallelMinimum,
            ..
        }
    ));
    // Two of 1/0 at 75 °C: 2 x 150 A.
    assert_near(si(pair.ampacity.as_ref().unwrap()), 300.0);
    let run = RunInput {
        size: Some(WireSize::Awg1),
        ..run
    };
    let (_, notes) = sized(&run, 100.0);
    assert_eq!(only_note(&notes, "parallel-too-small").grade, Grade::Stop);
}

#[test]
fn a_load_which_no_size_carries_is_a_stop_and_gets_no_size() {
    // 600 A: 750 A; the largest, 2000 kcmil, has 665 A at 75 °C. Two sets of 1/0 and more carry it: 2 x 380 A of 500 kcmil.
    let (single, notes) = sized(&field_run(30.0, 3), 600.0);
    assert_eq!(
        single.choice,
        ConductorChoice::NoneFits {
            largest: WireSize::Kcmil2000,
            carries: Current::amperes(665.0),
            needed: Current::amperes(750.0),
        }
    );
    assert_eq!(only_note(&notes, "no-conductor-fits").grade, Grade::Stop);
    let run = RunInput {
        sets: entered(2),
        ..field_run(30.0, 3)
    };
    assert_eq!(sized(&run, 600.0).0.installed(), Some(WireSize::Kcmil500));
}

#[test]
fn an_entered_size_which_is_too_small_is_a_stop_and_stays_entered() {
    // 40 A: 50 A; 10 AWG has 35 A at 75 °C.
    let run = RunInput {
        size: Some(WireSize::Awg10),
        ..field_run(30.0, 3)
    };
    let (thin, notes) = sized(&run, 40.0);
    assert_eq!(thin.installed(), Some(WireSize::Awg10));
    assert_eq!(thin.smallest(), Some(WireSize::Awg8));
    let note = only_note(&notes, "conductor-too-small");
    assert_eq!(note.grade, Grade::Stop);
}

#[test]
fn runs_lie_inside_ahead_of_the_drive_and_in_the_field_behind_it_unless_entered() {
    let usual = feeder(&[(Field::MotorPower, horsepower(10.0))]);
    let is_inside = |run: &Option<Conductors>| {
        matches!(
            run.as_ref().unwrap().input.surrounding,
            Surrounding::Inside { .. }
        )
    };
    assert!(is_inside(&usual.ahead) && !is_inside(&usual.behind));
    let other = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (
            Field::Run(Run::Ahead, RunField::Place),
            choice(Choice::Field),
        ),
        (
            Field::Run(Run::Behind, RunField::Place),
            choice(Choice::Inside),
        ),
    ]);
    assert!(!is_inside(&other.ahead) && is_inside(&other.behind));
}

#[test]
fn the_inside_table_from_memory_is_asked_about_once_for_the_sheet() {
    // Runs inside of 14 AWG (5 A: 6.25 A), 6 AWG (40 A: 50 A) and 14 AWG again.
    let worked = panel(
        &[],
        &[
            &[
                (Field::DriveInput, amperes(5.0)),
                (Field::MotorPower, horsepower(3.0)),
            ],
            &[
                (Field::DriveInput, amperes(40.0)),
                (Field::MotorPower, horsepower(30.0)),
            ],
            &[
                (Field::DriveInput, amperes(5.0)),
                (Field::MotorPower, horsepower(3.0)),
            ],
        ],
    );
    let about_the_table = worked.notes.iter().filter(|note| {
        matches!(
            &note.kind,
            NoteKind::TableFromMemory {
                table: MemoryTable::InsideAmpacity,
                ..
            }
        )
    });
    let notes: Vec<&MarginNote> = about_the_table.collect();
    assert_eq!(notes.len(), 1, "{notes:?}");
    assert_eq!(notes[0].grade, Grade::Query);
    let NoteKind::TableFromMemory { rows, .. } = &notes[0].kind else {
        panic!("{notes:?}");
    };
    assert_eq!(rows, &["14", "6"]);
}

// --- voltage drop ---------------------------------------------------------------------------------------------------

#[test]
fn the_drop_behind_the_drive_is_that_of_the_motors_current_and_refers_to_the_supply() {
    // 40 hp: 52 A, so 65 A; unmarked, 60 °C: 4 AWG 70 A. Table 9 in steel: R 0.31, X 0.060 ohm for 1000 ft.
    // sqrt(3) x 52 A x (0.31 x 0.85 + 0.060 x 0.526783) ohm x 0.35 = 9.30275 V, of 480 V: 1.93807 per cent.
    let far = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
        (Field::Run(Run::Behind, RunField::Length), feet(350.0)),
        (Field::Run(Run::Behind, RunField::Ambient), celsius(30.0)),
    ]);
    let behind = far.behind.as_ref().unwrap();
    assert_eq!(behind.installed(), Some(WireSize::Awg4));
    let drop: Voltage = behind.drop.as_ref().unwrap().quantity().unwrap();
    assert_near(drop.to_volts(), 9.302_75);
    assert_near(si(behind.drop_ratio.as_ref().unwrap()), 0.019_380_7);
}

#[test]
fn the_drop_ahead_of_the_drive_is_that_of_its_input_current() {
    // 50 A: 62.5 A; 4 AWG again. 10 ft: sqrt(3) x 50 A x 0.295107 ohm x 0.01 = 0.255570 V.
    let near = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
        (Field::Run(Run::Ahead, RunField::Length), feet(10.0)),
    ]);
    let ahead = near.ahead.as_ref().unwrap();
    assert_eq!(ahead.installed(), Some(WireSize::Awg4));
    assert_near(si(ahead.drop.as_ref().unwrap()), 0.255_570);
}

#[test]
fn a_drop_of_both_runs_above_three_per_cent_is_a_note() {
    // Behind 1.93807 per cent for 350 ft, so 2.76867 for 500 and 3.32241 for 600; ahead 2 m, or 6.5617 ft: 0.034937.
    let over = |length: f64| {
        feeder(&[
            (Field::MotorPower, horsepower(40.0)),
            (Field::DriveInput, amperes(50.0)),
            (Field::Run(Run::Behind, RunField::Length), feet(length)),
            (Field::Run(Run::Behind, RunField::Ambient), celsius(30.0)),
        ])
    };
    let far = over(600.0);
    assert_near(si(far.drop_ratio.as_ref().unwrap()), 0.033_573_4);
    assert_eq!(
        only_note(&far.notes, "drop-above-advice").grade,
        Grade::Note
    );
    let near = over(500.0);
    assert_near(si(near.drop_ratio.as_ref().unwrap()), 0.028_036_1);
    assert_no_note(&near.notes, "drop-above-advice");
}

#[test]
fn a_size_which_table_9_leaves_out_has_no_drop_and_says_so() {
    let large = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::Run(Run::Behind, RunField::Length), feet(350.0)),
        (
            Field::Run(Run::Behind, RunField::Size),
            Entry::Size(WireSize::Kcmil700),
        ),
    ]);
    let behind = large.behind.as_ref().unwrap();
    assert!(behind.drop.is_none() && behind.drop_ratio.is_none());
    assert_eq!(only_note(&large.notes, "drop-unknown").grade, Grade::Note);
}

// --- branch devices -------------------------------------------------------------------------------------------------

#[test]
fn a_product_which_is_a_standard_rating_stands_and_any_other_goes_up_to_the_next() {
    // 1.75 x 40 A = 70 A is one; 1.75 x 34 A = 59.5 A goes to 60; 2.5 x 27 A = 67.5 A to 70; 3 x 34 A = 102 A to 110.
    for (power, device, expected) in [
        (30.0, Choice::TimeDelayFuse, 70.0),
        (25.0, Choice::TimeDelayFuse, 60.0),
        (20.0, Choice::InverseTimeBreaker, 70.0),
        (25.0, Choice::NontimeDelayFuse, 110.0),
    ] {
        let sized = feeder(&[
            (Field::MotorPower, horsepower(power)),
            (Field::DeviceType, choice(device)),
        ]);
        assert_amperes(&rating(&sized), expected);
    }
}

#[test]
fn a_drives_largest_device_which_is_no_standard_rating_gives_the_next_one_below() {
    // 40 hp: 1.75 x 52 A = 91 A, so 100 A; the drive permits 63 A: 60 A.
    let held = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::LargestPermitted, amperes(63.0)),
    ]);
    assert_amperes(&rating(&held), 60.0);
    let note = only_note(&held.notes, "limit-not-standard");
    assert_eq!(note.grade, Grade::Note);
    assert_eq!(
        note.kind,
        NoteKind::LimitNotStandard {
            limit: Current::amperes(63.0),
            taken: Current::amperes(60.0),
        }
    );
    // 60 A is one itself.
    let held = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::LargestPermitted, amperes(60.0)),
    ]);
    assert_amperes(&rating(&held), 60.0);
    assert_eq!(
        only_note(&held.notes, "device-held-by-drive").kind,
        NoteKind::DeviceHeldByDrive {
            by_rule: Current::amperes(100.0),
            taken: Current::amperes(60.0),
        }
    );
    // A limit above the rule's rating changes nothing.
    let free = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::LargestPermitted, amperes(125.0)),
    ]);
    assert_amperes(&rating(&free), 100.0);
}

#[test]
fn a_drives_largest_device_below_every_standard_rating_is_a_stop() {
    // The smallest breaker of 2023 is 10 A, the smallest fuse 1 A.
    for (device, limit) in [
        (Choice::InverseTimeBreaker, 9.0),
        (Choice::TimeDelayFuse, 0.9),
    ] {
        let held = feeder(&[
            (Field::MotorPower, horsepower(40.0)),
            (Field::DeviceType, choice(device)),
            (Field::LargestPermitted, amperes(limit)),
        ]);
        assert!(rating(&held).is_none());
        assert_eq!(
            only_note(&held.notes, "limit-below-standard").grade,
            Grade::Stop
        );
    }
}

#[test]
fn a_device_type_which_the_drive_does_not_list_is_a_stop_and_has_no_rating() {
    // 10 hp: 2.5 x 14 A = 35 A by the rule.
    let other = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::DeviceType, choice(Choice::InverseTimeBreaker)),
        (
            Field::PermittedTypes,
            Entry::Choices(BTreeSet::from([Choice::TimeDelayFuse])),
        ),
    ]);
    assert!(rating(&other).is_none());
    let note = only_note(&other.notes, "device-type-not-permitted");
    assert_eq!(note.grade, Grade::Stop);
    assert_eq!(
        note.kind,
        NoteKind::DeviceTypeNotPermitted {
            by_rule: Current::amperes(35.0)
        }
    );
    // Without a type entered, one of the list is taken.
    let listed = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (
            Field::PermittedTypes,
            Entry::Choices(BTreeSet::from([Choice::InverseTimeBreaker])),
        ),
    ]);
    assert_amperes(&rating(&listed), 35.0);
}

#[test]
fn class_cc_ends_at_30_amperes_with_a_note_where_that_is_enough_and_a_stop_where_not() {
    let class_cc = |power: f64, input: f64| {
        feeder(&[
            (Field::MotorPower, horsepower(power)),
            (Field::DriveInput, amperes(input)),
            (Field::DeviceType, choice(Choice::ClassCcFuse)),
        ])
    };
    // 3 hp: 3 x 4.8 A = 14.4 A, so 15 A; nothing ends there.
    let small = class_cc(3.0, 6.0);
    assert_amperes(&rating(&small), 15.0);
    assert_no_note(&small.notes, "class-cc-ends");
    // 10 hp: 3 x 14 A = 42 A, so 45 A. 1.25 x 24 A = 30 A is just enough.
    let medium = class_cc(10.0, 24.0);
    assert_amperes(&rating(&medium), 30.0);
    let note = only_note(&medium.notes, "class-cc-ends");
    assert_eq!(note.grade, Grade::Note);
    assert_eq!(
        note.kind,
        NoteKind::ClassCcEnds {
            by_rule: Current::amperes(45.0),
            taken: Current::amperes(30.0),
        }
    );
    // 1.25 x 24.1 A = 30.125 A is not.
    let beyond = class_cc(10.0, 24.1);
    assert!(rating(&beyond).is_none());
    assert_eq!(
        only_note(&beyond.notes, "class-cc-too-small").grade,
        Grade::Stop
    );
    // The larger of the two currents counts: a 20 hp motor takes 27 A, 1.25 x 27 A = 33.75 A, whatever its drive.
    let motor = class_cc(20.0, 20.0);
    assert!(rating(&motor).is_none());
    assert_eq!(
        only_note(&motor.notes, "class-cc-too-small").grade,
        Grade::Stop
    );
}

#[test]
fn the_smallest_breaker_of_2023_is_10_amperes_and_fuses_go_lower() {
    // 0.5 hp: 1.1 A. 2.5 x 1.1 = 2.75 A, 1.75 x 1.1 = 1.925 A, 3 x 1.1 = 3.3 A.
    for (device, expected) in [
        (Choice::InverseTimeBreaker, 10.0),
        (Choice::TimeDelayFuse, 3.0),
        (Choice::NontimeDelayFuse, 6.0),
    ] {
        let small = feeder(&[
            (Field::MotorPower, horsepower(0.5)),
            (Field::DeviceType, choice(device)),
        ]);
        assert_amperes(&rating(&small), expected);
    }
}

#[test]
fn an_entered_rating_above_what_rule_and_drive_permit_is_a_stop() {
    // 10 hp: 1.75 x 14 A = 24.5 A, so 25 A.
    let above = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(16.0)),
        (Field::DeviceRating, amperes(30.0)),
    ]);
    assert_amperes(&rating(&above), 30.0);
    assert_eq!(
        only_note(&above.notes, "device-above-maximum").grade,
        Grade::Stop
    );
    let below = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(16.0)),
        (Field::DeviceRating, amperes(20.0)),
    ]);
    assert_no_note(&below.notes, "device-above-maximum");
    assert_no_note(&below.notes, "device-below-input");
    let odd = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(16.0)),
        (Field::DeviceRating, amperes(18.0)),
    ]);
    assert_eq!(
        only_note(&odd.notes, "device-not-standard").grade,
        Grade::Query
    );
}

#[test]
fn a_device_below_the_drives_input_is_a_query() {
    // 40 hp drive of 50 A, held to 30 A.
    let low = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
        (Field::LargestPermitted, amperes(30.0)),
    ]);
    assert_amperes(&rating(&low), 30.0);
    assert_eq!(
        only_note(&low.notes, "device-below-input").grade,
        Grade::Query
    );
}

#[test]
fn the_disconnect_has_115_per_cent_of_the_drives_input() {
    // 430.128: 1.15 x 50 A = 57.5 A.
    let sized = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
    ]);
    assert_near(si(sized.disconnect.as_ref().unwrap()), 57.5);
}

// --- grounding conductors -------------------------------------------------------------------------------------------

/// The figure which was put into `figure` under `symbol`.
fn term_figure(figure: &Figure, symbol: &str) -> Arc<Figure> {
    let term = figure.terms.iter().find(|term| term.symbol == symbol);
    match &term.unwrap().origin {
        Origin::Figure(below) => Arc::clone(below),
        other => panic!("{symbol} is no figure but {other:?}"),
    }
}

/// A 20 hp feeder of 28 A input, held to a 40 A device: 1.25 x 28 A = 35 A, inside at 60 °C 8 AWG (40 A).
fn forty_ampere_feeder(more: &[(Field, Entry)]) -> Arc<WorkedFeeder> {
    let mut entries = vec![
        (Field::MotorPower, horsepower(20.0)),
        (Field::DriveInput, amperes(28.0)),
        (Field::LargestPermitted, amperes(40.0)),
    ];
    entries.extend_from_slice(more);
    feeder(&entries)
}

#[test]
fn a_grounding_conductor_follows_the_device_where_the_phases_are_the_smallest() {
    // Table 250.122 to 60 A: 10 AWG.
    let sized = forty_ampere_feeder(&[]);
    assert_amperes(&rating(&sized), 40.0);
    let ahead = sized.ahead.as_ref().unwrap();
    assert_eq!(ahead.installed(), Some(WireSize::Awg8));
    assert_eq!(grounding(ahead), Some(WireSize::Awg10));
}

#[test]
fn a_grounding_conductor_grows_with_phases_enlarged_by_choice_by_the_unrounded_ratio() {
    // 8 to 6 AWG: 26 240 / 16 510 = 1.589340; x 10 380 = 16 497.3 circular mils: 8 AWG (16 510) has them. With the ratio
    // rounded to 1.6 it would have been 16 608, and 6 AWG.
    let enlarged = forty_ampere_feeder(&[(
        Field::Run(Run::Ahead, RunField::Size),
        Entry::Size(WireSize::Awg6),
    )]);
    let ahead = enlarged.ahead.as_ref().unwrap();
    assert_eq!(ahead.smallest(), Some(WireSize::Awg8));
    assert_eq!(grounding(ahead), Some(WireSize::Awg8));
    let area = term_figure(ahead.grounding.as_ref().unwrap(), "A_g");
    let ratio = term_figure(&area, "r");
    assert_near(ratio.quantity::<Ratio>().unwrap().to_one(), 1.589_340);
    let area = area.quantity::<CrossSection>().unwrap();
    assert_near(area.to_circular_mils(), 16_497.3);
}

#[test]
fn growth_for_ambient_and_count_alone_enlarges_no_grounding_conductor() {
    // Behind the drive: 27 A, so 33.75 A; 8 AWG (50 A at 75 °C) in twelve conductors (0.5) at 45 °C (0.82) leaves 20.5 A,
    // 6 AWG 26.65, 4 AWG 34.85: 4 AWG for ambient and count. The device of 40 A still asks for 10 AWG.
    let crowded = forty_ampere_feeder(&[
        (Field::Run(Run::Behind, RunField::Ambient), celsius(45.0)),
        (
            Field::Run(Run::Behind, RunField::Carrying),
            Entry::Count(12),
        ),
        (
            Field::Run(Run::Behind, RunField::Terminal),
            choice(Choice::Marked75),
        ),
    ]);
    let behind = crowded.behind.as_ref().unwrap();
    assert_eq!(behind.installed(), Some(WireSize::Awg4));
    assert_eq!(grounding(behind), Some(WireSize::Awg10));
    // Enlarged from there by choice, to 2 AWG: 66 360 / 41 740 = 1.58984; x 10 380 = 16 502.6: 8 AWG.
    let enlarged = forty_ampere_feeder(&[
        (Field::Run(Run::Behind, RunField::Ambient), celsius(45.0)),
        (
            Field::Run(Run::Behind, RunField::Carrying),
            Entry::Count(12),
        ),
        (
            Field::Run(Run::Behind, RunField::Terminal),
            choice(Choice::Marked75),
        ),
        (
            Field::Run(Run::Behind, RunField::Size),
            Entry::Size(WireSize::Awg2),
        ),
    ]);
    assert_eq!(
        grounding(enlarged.behind.as_ref().unwrap()),
        Some(WireSize::Awg8)
    );
}

#[test]
fn a_grounding_conductor_is_never_larger_than_its_phase_conductor() {
    // 5 hp: 7.6 A; nontime-delay 3 x 7.6 = 22.8 A, so 25 A and 10 AWG by the table. 1.25 x 7.6 A = 9.5 A is 14 AWG.
    let capped = feeder(&[
        (Field::MotorPower, horsepower(5.0)),
        (Field::DriveInput, amperes(8.0)),
        (Field::DeviceType, choice(Choice::NontimeDelayFuse)),
    ]);
    assert_amperes(&rating(&capped), 25.0);
    let behind = capped.behind.as_ref().unwrap();
    assert_eq!(behind.installed(), Some(WireSize::Awg14));
    assert_eq!(grounding(behind), Some(WireSize::Awg14));
    // That is everyday on motor circuits, and not spoken of. A growth which stops there is: 12 instead of 14 AWG asks for
    // 6530 / 4110 x 10 380 = 16 492 circular mils, 8 AWG, and gets 12 AWG.
    assert_no_note(&capped.notes, "grounding-capped");
    let grown = feeder(&[
        (Field::MotorPower, horsepower(5.0)),
        (Field::DriveInput, amperes(8.0)),
        (Field::DeviceType, choice(Choice::NontimeDelayFuse)),
        (
            Field::Run(Run::Behind, RunField::Size),
            Entry::Size(WireSize::Awg12),
        ),
    ]);
    assert_eq!(
        grounding(grown.behind.as_ref().unwrap()),
        Some(WireSize::Awg12)
    );
    assert_eq!(
        only_note(&grown.notes, "grounding-capped").grade,
        Grade::Note
    );
}

// --- the panel ------------------------------------------------------------------------------------------------------

/// Drives of 50, 26 and 13 A for motors of 40, 20 and 10 hp: 52, 27 and 14 A.
fn three_drives() -> [Vec<(Field, Entry)>; 3] {
    [(40.0, 50.0), (20.0, 26.0), (10.0, 13.0)].map(|(power, input)| {
        vec![
            (Field::MotorPower, horsepower(power)),
            (Field::DriveInput, amperes(input)),
        ]
    })
}

#[test]
fn several_drives_take_125_per_cent_of_the_largest_input_and_100_of_the_others() {
    // 409.20, 430.24, 430.122(D): 1.25 x 50 + 26 + 13 = 101.5 A. Running 89 A.
    let worked = panel_of(&[], &three_drives());
    assert_near(
        si(&worked.incoming.conductors.as_ref().unwrap().required),
        101.5,
    );
    assert_near(si(worked.incoming.running.as_ref().unwrap()), 89.0);
    // 101.5 A at unmarked terminals are read at 75 °C. In air of 40 °C, 0.88: 2 AWG 115 x 0.88 = 101.2 A is 0.3 A short,
    // 1 AWG has 130 x 0.88 = 114.4 A.
    let conductors = worked.incoming.conductors.as_ref().unwrap();
    assert_eq!(conductors.installed(), Some(WireSize::Awg1));
}

#[test]
fn the_largest_drive_is_the_one_with_the_largest_input_not_the_largest_motor() {
    // A 10 hp motor on a drive of 60 A, a 40 hp motor on one of 50 A: 1.25 x 60 + 50 = 125 A.
    let worked = panel_of(
        &[],
        &[
            vec![
                (Field::MotorPower, horsepower(10.0)),
                (Field::DriveInput, amperes(60.0)),
            ],
            vec![
                (Field::MotorPower, horsepower(40.0)),
                (Field::DriveInput, amperes(50.0)),
            ],
        ],
    );
    assert_near(
        si(&worked.incoming.conductors.as_ref().unwrap().required),
        125.0,
    );
}

#[test]
fn what_stands_by_counts_in_the_connected_sums_alone() {
    // The 50 A drive stands by: 1.25 x 26 + 13 = 45.5 A; connected 101.5 A. Running 39 A of 89 A.
    let mut drives = three_drives();
    drives[0].push((Field::Running, choice(Choice::Standby)));
    let worked = panel_of(&[], &drives);
    let incoming = &worked.incoming;
    assert_near(si(&incoming.conductors.as_ref().unwrap().required), 45.5);
    assert_near(si(incoming.required_connected.as_ref().unwrap()), 101.5);
    assert_near(si(incoming.running.as_ref().unwrap()), 39.0);
    assert_near(si(incoming.connected.as_ref().unwrap()), 89.0);
    let note = only_note(&worked.notes, "standing-by");
    assert_eq!(note.grade, Grade::Note);
}

#[test]
fn another_load_counts_once() {
    // A control supply of 3 A: 101.5 + 3 = 104.5 A.
    let mut sheet = sheet(&[], &three_drives());
    sheet.sources.push(item(
        100,
        &[
            (Field::SourceHeat, watts(60.0)),
            (Field::SourceCurrent, amperes(3.0)),
        ],
    ));
    let worked = work_out(&sheet);
    assert_near(
        si(&worked.incoming.conductors.as_ref().unwrap().required),
        104.5,
    );
    assert_near(si(worked.incoming.running.as_ref().unwrap()), 92.0);
}

#[test]
fn the_main_device_works_the_branches_again_for_its_own_type() {
    // Branches are time-delay fuses: 1.75 x 52 = 91 A, so 100 A. For a breaker: 2.5 x 52 = 130 A, so 150 A; with 27 and
    // 14 A of the other motors 191 A, and 175 A is the largest standard rating not above it.
    let breaker = panel_of(&[], &three_drives());
    let main = breaker.incoming.main.as_ref().unwrap();
    assert_near(si(&main.sum), 191.0);
    assert_amperes(&main.rating, 175.0);
    // By the drives' input currents, beside it: 150 + 26 + 13 = 189 A.
    assert_near(si(&main.sum_by_inputs), 189.0);
    // For time-delay fuses as the main: 100 + 27 + 14 = 141 A, so 125 A.
    let fuses = panel_of(
        &[(Field::MainType, choice(Choice::TimeDelayFuse))],
        &three_drives(),
    );
    let main = fuses.incoming.main.as_ref().unwrap();
    assert_near(si(&main.sum), 141.0);
    assert_amperes(&main.rating, 125.0);
}

#[test]
fn the_main_device_keeps_the_branches_under_the_drives_own_limit() {
    // The first drive permits 100 A: 100 + 27 + 14 = 141 A instead of 191 A.
    let mut drives = three_drives();
    drives[0].push((Field::LargestPermitted, amperes(100.0)));
    let worked = panel_of(&[], &drives);
    let main = worked.incoming.main.as_ref().unwrap();
    assert_near(si(&main.sum), 141.0);
    assert_amperes(&main.rating, 125.0);
}

#[test]
fn a_branch_device_entered_below_what_is_permitted_counts_as_it_is() {
    // The first branch is built with 60 A instead of 100 A: 60 + 27 + 14 = 101 A, so 100 A.
    let mut drives = three_drives();
    drives[0].push((Field::DeviceRating, amperes(60.0)));
    let worked = panel_of(&[(Field::MainType, choice(Choice::TimeDelayFuse))], &drives);
    let main = worked.incoming.main.as_ref().unwrap();
    assert_near(si(&main.sum), 101.0);
    assert_amperes(&main.rating, 100.0);
}

#[test]
fn a_main_of_a_type_which_no_drive_permits_is_a_stop() {
    let small = vec![
        (Field::MotorPower, horsepower(0.5)),
        (Field::DriveInput, amperes(1.5)),
        (Field::LargestPermitted, amperes(6.0)),
    ];
    let worked = panel_of(&[], &[small]);
    assert!(worked.incoming.main.is_none());
    assert_eq!(
        only_note(&worked.notes, "no-branch-for-main").grade,
        Grade::Stop
    );
}

#[test]
fn a_main_rating_which_is_no_standard_rating_is_a_query() {
    let worked = panel_of(&[(Field::MainRating, amperes(93.0))], &three_drives());
    let note = only_note(&worked.notes, "device-not-standard");
    assert_eq!(
        (note.grade, note.place.field),
        (Grade::Query, Field::MainRating)
    );
}

#[test]
fn a_total_over_a_motor_whose_drive_is_unknown_is_never_within() {
    // A motor current alone gives no drive input: the sums are short of it.
    let mut drives = three_drives().to_vec();
    assert_eq!(
        verdict(&panel_of(&[], &drives), TotalKind::IncomingCurrent),
        Verdict::Within
    );
    drives.push(vec![(Field::MotorCurrent, amperes(10.0))]);
    let worked = panel_of(&[], &drives);
    only_note(&worked.notes, "main-incomplete");
    for kind in [TotalKind::IncomingCurrent, TotalKind::MainDevice] {
        assert_eq!(verdict(&worked, kind), Verdict::Unknown, "{kind:?}");
    }
}

#[test]
fn a_motor_which_is_not_in_the_table_leaves_no_total_within() {
    // 250 hp has no row at 230 V: it runs all the same, and nothing may be found within without it.
    let giant = vec![(Field::MotorPower, horsepower(250.0))];
    let small = vec![
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(30.0)),
    ];
    let worked = panel_of(&[(Field::SupplyVoltage, volts(240.0))], &[giant, small]);
    only_note(&worked.notes, "main-incomplete");
    only_note(&worked.notes, "ledger-incomplete");
    for kind in [TotalKind::IncomingCurrent, TotalKind::MainDevice] {
        assert_eq!(verdict(&worked, kind), Verdict::Unknown, "{kind:?}");
    }
}

#[test]
fn losses_count_before_the_supply_voltage_is_known() {
    let drive = [
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveLoss, watts(900.0)),
    ];
    let mut sheet = sheet(&[], &[drive.to_vec()]);
    sheet.record.clear(Field::SupplyVoltage);
    let worked = work_out(&sheet);
    assert_near(si(&worked.ledger.running), 900.0);
    assert_eq!(
        verdict(&worked, TotalKind::InsideTemperature),
        Verdict::Unknown
    );
}

#[test]
fn an_outdoor_enclosure_without_the_heat_of_the_sun_is_never_within() {
    let worked = boxed(&[(Field::Surroundings, choice(Choice::Outdoors))], &[]);
    only_note(&worked.notes, "sun-missing");
    assert_eq!(
        verdict(&worked, TotalKind::InsideTemperature),
        Verdict::Unknown
    );
}

#[test]
fn the_drop_of_one_run_is_not_shown_as_that_of_both() {
    let open = feeder(&three_drives()[0]);
    assert!(open.drop_ratio.is_none());
    assert_eq!(only_note(&open.notes, "length-missing").grade, Grade::Query);
    let mut entries = three_drives()[0].clone();
    entries.push((Field::Run(Run::Behind, RunField::Length), feet(100.0)));
    let known = feeder(&entries);
    assert!(known.drop_ratio.is_some());
    assert_no_note(&known.notes, "length-missing");
}

#[test]
fn a_standby_which_asks_for_more_than_what_runs_is_a_query() {
    let standby = |power: f64, input: f64| {
        vec![
            (Field::MotorPower, horsepower(power)),
            (Field::DriveInput, amperes(input)),
            (Field::Running, choice(Choice::Standby)),
        ]
    };
    let duty = three_drives()[2].clone();
    let larger = panel_of(&[], &[duty.clone(), standby(40.0, 50.0)]);
    assert_eq!(
        only_note(&larger.notes, "standby-larger").grade,
        Grade::Query
    );
    let equal = panel_of(&[], &[duty, standby(10.0, 13.0)]);
    assert_no_note(&equal.notes, "standby-larger");
}

#[test]
fn a_reactor_of_another_current_counts_for_what_it_is_to_the_drive() {
    // 3 % of 100 A is 0.03 x 14 / 100 = 0.42 % of the motor's 14 A: no smoothing, so 0.60 stays, and 17.93 A with it:
    // 7460 / (0.86 x 0.97 x 831.384 x 0.60).
    let far = feeder(&[
        (Field::MotorPower, horsepower(10.0)),
        (Field::ReactorPercent, per_cent(3.0)),
        (Field::ReactorReference, choice(Choice::OfOwnCurrent)),
        (Field::ReactorReferenceCurrent, amperes(100.0)),
    ]);
    assert_amperes(&far.drive_input, 17.927_3);
    // On a bus with capacitors 3 % is advised; 3 % of twice the drive's current is 1.5 %.
    let entries = vec![
        (Field::MotorPower, horsepower(10.0)),
        (Field::DriveInput, amperes(14.0)),
        (Field::ReactorPercent, per_cent(3.0)),
        (Field::ReactorReference, choice(Choice::OfOwnCurrent)),
        (Field::ReactorReferenceCurrent, amperes(28.0)),
    ];
    let worked = panel_of(&[(Field::Capacitors, choice(Choice::Yes))], &[entries]);
    let note = only_note(&worked.notes, "reactor-below-advice");
    let NoteKind::ReactorBelowAdvice { entered, .. } = note.kind else {
        panic!("{note:?}");
    };
    assert_near(entered.to_per_cent(), 1.5);
}

#[test]
fn a_fault_current_answers_for_the_source_impedance_and_leaves_its_power_open() {
    // A drive of 13 A against 39 kA at the same voltage: 13 / 39 000 = 0.0333 %, under 1 %.
    let drive = three_drives()[2].clone();
    let worked = panel_of(
        &[(Field::SourceFaultCurrent, kiloamperes(39.0))],
        std::slice::from_ref(&drive),
    );
    let reactor = &worked.feeders[0].reactor;
    assert_eq!(reactor.reasons, [ReactorReason::SourceImpedance]);
    let impedance = reactor.source_impedance.as_ref().unwrap();
    assert_near(si(impedance), 13.0 / 39_000.0);
    only_note(&worked.notes, "source-unknown");
    let unknown = panel_of(&[], &[drive]);
    assert!(unknown.feeders[0].reactor.reasons.is_empty());
    only_note(&unknown.notes, "source-unknown");
}

#[test]
fn parallel_conductors_in_a_column_without_cells_are_a_stop_without_a_number() {
    // Inside, two sets, 1.25 x 50 A = 62.5 A: unmarked terminals ask for 60 °C, which ends at 1 AWG.
    let mut entries = three_drives()[0].clone();
    entries.push((Field::Run(Run::Ahead, RunField::Sets), Entry::Count(2)));
    let sized = feeder(&entries);
    assert_eq!(
        sized.ahead.as_ref().unwrap().choice,
        ConductorChoice::NoCell {
            column: Column::C60
        }
    );
    assert_eq!(
        only_note(&sized.notes, "no-cell-in-column").grade,
        Grade::Stop
    );
}

#[test]
fn a_sealed_enclosure_within_its_limit_only_by_a_hair_is_a_query() {
    // 300 W over 31.416 W/K is 9.549 K: 44.549 °C. A quarter of the rise is 2.387 K.
    let near = boxed(&[(Field::InsideLimit, celsius(46.0))], &[]);
    assert_eq!(
        only_note(&near.notes, "wall-rule-near-limit").grade,
        Grade::Query
    );
    let clear = boxed(&[(Field::InsideLimit, celsius(50.0))], &[]);
    assert_no_note(&clear.notes, "wall-rule-near-limit");
}

#[test]
fn other_loads_are_said_to_count_at_their_current() {
    let worked = boxed(
        &[],
        &[
            (Field::SourceHeat, watts(10.0)),
            (Field::SourceCurrent, amperes(2.0)),
        ],
    );
    assert_eq!(
        only_note(&worked.notes, "other-loads-at-current").grade,
        Grade::Note
    );
}

#[test]
fn a_loss_entered_for_no_reactor_is_a_query_and_no_heat() {
    let plain = feeder(&three_drives()[0]);
    let mut entries = three_drives()[0].clone();
    entries.push((Field::ReactorLoss, watts(80.0)));
    let idle = feeder(&entries);
    only_note(&idle.notes, "reactor-loss-unused");
    assert_near(
        si(idle.heat.total.as_ref().unwrap()),
        si(plain.heat.total.as_ref().unwrap()),
    );
}

#[test]
fn a_drive_which_permits_no_device_of_the_mains_type_counts_among_the_others() {
    // A 0.5 hp drive with fuses of 6 A at most: no breaker is so small. Its motor's 1.1 A runs all the same:
    // 150 + 27 + 14 + 1.1 = 192.1 A, and by the drives' inputs 150 + 26 + 13 + 1.5 = 190.5 A.
    let [first, second, third] = three_drives();
    let small = vec![
        (Field::MotorPower, horsepower(0.5)),
        (Field::DriveInput, amperes(1.5)),
        (Field::LargestPermitted, amperes(6.0)),
    ];
    let worked = panel_of(&[], &[small, first, second, third]);
    let main = worked.incoming.main.as_ref().unwrap();
    assert_near(si(&main.sum), 192.1);
    assert_near(si(&main.sum_by_inputs), 190.5);
    assert_amperes(&main.rating, 175.0);
}

#[test]
fn of_equal_largest_devices_the_one_with_the_larger_motor_counts_as_the_largest() {
    // As breakers both are 70 A: 2.5 x 27 = 67.5 A and 2.5 x 26 = 65 A. 70 + 26 = 96 A, not 70 + 27; rounded down 90 A.
    let twins = |currents: [f64; 2]| {
        let drives = currents.map(|motor| {
            vec![
                (Field::MotorPower, horsepower(20.0)),
                (Field::MotorCurrent, amperes(motor)),
                (Field::DriveInput, amperes(30.0)),
            ]
        });
        panel_of(&[], &drives)
    };
    for currents in [[27.0, 26.0], [26.0, 27.0]] {
        let worked = twins(currents);
        let main = worked.incoming.main.as_ref().unwrap();
        assert_near(si(&main.sum), 96.0);
        assert_amperes(&main.rating, 90.0);
    }
}

#[test]
fn an_entered_main_device_above_the_sum_is_a_stop() {
    // 191 A: 200 A is above it, 175 A is not.
    let above = panel_of(&[(Field::MainRating, amperes(200.0))], &three_drives());
    assert_eq!(
        only_note(&above.notes, "main-above-maximum").grade,
        Grade::Stop
    );
    assert_eq!(verdict(&above, TotalKind::MainDevice), Verdict::Beyond);
    let within = panel_of(&[(Field::MainRating, amperes(175.0))], &three_drives());
    assert_no_note(&within.notes, "main-above-maximum");
    assert_eq!(verdict(&within, TotalKind::MainDevice), Verdict::Within);
}

#[test]
fn several_drives_on_a_bus_are_a_note_and_no_advice() {
    let many = panel_of(&[], &three_drives());
    let note = only_note(&many.notes, "several-drives");
    assert_eq!(note.grade, Grade::Note);
    assert_eq!(note.kind, NoteKind::SeveralDrives { drives: 3 });
    assert!(
        many.feeders
            .iter()
            .all(|feeder| feeder.reactor.advised.is_none())
    );
    let [first, ..] = three_drives();
    assert_no_note(&panel_of(&[], &[first]).notes, "several-drives");
}

// --- fault current --------------------------------------------------------------------------------------------------

const TRANSFORMER: [(Field, f64, Unit); 2] = [
    (Field::TransformerPower, 500.0, Unit::KilovoltAmpere),
    (Field::TransformerImpedance, 5.75, Unit::PerCent),
];

fn transformer(more: &[(Field, Entry)]) -> Vec<(Field, Entry)> {
    let mut entries: Vec<(Field, Entry)> = TRANSFORMER
        .iter()
        .map(|(field, number, unit)| (*field, measured(*number, *unit)))
        .collect();
    entries.extend_from_slice(more);
    entries
}

#[test]
fn the_largest_fault_current_counts_nine_tenths_of_a_nameplate_impedance() {
    // 500 kVA / (sqrt(3) x 480 V) = 601.407 A; / (0.9 x 0.0575) = 11 621.4 A; measured: / 0.0575 = 10 459.2 A.
    let [first, ..] = three_drives();
    for (more, expected) in [
        (vec![], 11_621.4),
        (
            vec![(Field::ImpedanceKind, choice(Choice::MeasuredImpedance))],
            10_459.2,
        ),
    ] {
        let worked = panel_of(&transformer(&more), std::slice::from_ref(&first));
        assert_near(
            si(worked.fault.transformer_current.as_ref().unwrap()),
            601.407,
        );
        assert_amperes(&worked.fault.at_source, expected);
    }
}

#[test]
fn the_incoming_run_takes_its_share_of_the_fault_current() {
    // 50 ft of 500 kcmil copper in PVC, C 26 706: f = sqrt(3) x 50 x 11 621.4 / (26 706 x 480) = 0.0785124,
    // M = 0.927203, 10 775.4 A at the panel.
    let [first, ..] = three_drives();
    let run = |part| Field::Run(Run::Incoming, part);
    let worked = panel_of(
        &transformer(&[
            (run(RunField::Length), feet(50.0)),
            (run(RunField::Size), Entry::Size(WireSize::Kcmil500)),
            (run(RunField::Conduit), choice(Choice::PvcConduit)),
        ]),
        &[first],
    );
    assert_near(si(worked.fault.run_factor.as_ref().unwrap()), 0.078_512_4);
    assert_near(si(worked.fault.multiplier.as_ref().unwrap()), 0.927_203);
    assert_amperes(&worked.fault.at_panel, 10_775.4);
}

#[test]
fn a_fault_current_which_is_entered_stands_before_the_transformer() {
    let [first, ..] = three_drives();
    let entered = transformer(&[(Field::SourceFaultCurrent, kiloamperes(22.0))]);
    let worked = panel_of(&entered, &[first]);
    assert_amperes(&worked.fault.at_source, 22_000.0);
    // Without the length of the run the current at its start stands for the panel, and is asked about.
    assert_amperes(&worked.fault.at_panel, 22_000.0);
    assert_eq!(
        only_note(&worked.notes, "fault-run-unknown").grade,
        Grade::Query
    );
}

#[test]
fn a_fault_current_is_within_only_where_every_rating_is_entered_and_reaches_it() {
    let [first, ..] = three_drives();
    let rated = |feeder: Option<f64>, main: Option<f64>| {
        let mut entries = vec![(Field::SourceFaultCurrent, kiloamperes(22.0))];
        entries.extend(main.map(|rating| (Field::MainShortCircuitRating, kiloamperes(rating))));
        let mut drive = first.clone();
        drive.extend(feeder.map(|rating| (Field::ShortCircuitRating, kiloamperes(rating))));
        panel_of(&entries, &[drive])
    };
    let within = rated(Some(30.0), Some(65.0));
    assert_eq!(verdict(&within, TotalKind::FaultCurrent), Verdict::Within);
    assert_no_note(&within.notes, "rating-missing");
    // Exactly the fault current is within.
    let equal = rated(Some(22.0), Some(65.0));
    assert_eq!(verdict(&equal, TotalKind::FaultCurrent), Verdict::Within);
    assert_no_note(&equal.notes, "fault-above-rating");
    let below = rated(Some(18.0), Some(65.0));
    assert_eq!(verdict(&below, TotalKind::FaultCurrent), Verdict::Beyond);
    assert_eq!(
        only_note(&below.notes, "fault-above-rating").grade,
        Grade::Stop
    );
    // A missing rating is never within, and one which is known to be too low is beyond all the same.
    for (feeder, main) in [(None, Some(65.0)), (Some(30.0), None), (None, None)] {
        let missing = rated(feeder, main);
        assert_eq!(verdict(&missing, TotalKind::FaultCurrent), Verdict::Unknown);
        assert_eq!(
            only_note(&missing.notes, "rating-missing").grade,
            Grade::Query
        );
    }
    let low = rated(Some(18.0), None);
    assert_eq!(verdict(&low, TotalKind::FaultCurrent), Verdict::Beyond);
}

// --- reactors -------------------------------------------------------------------------------------------------------

/// A 40 hp drive of `input` amperes on a source of so many kilovolt amperes with 5.75 per cent.
fn on_source(kilovolt_amperes: f64, input: f64, more: &[(Field, Entry)]) -> Worked {
    let mut entries = vec![
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(input)),
    ];
    entries.extend_from_slice(more);
    panel_of(
        &[
            (
                Field::TransformerPower,
                measured(kilovolt_amperes, Unit::KilovoltAmpere),
            ),
            (Field::TransformerImpedance, per_cent(5.75)),
        ],
        &[entries],
    )
}

fn reasons(worked: &Worked) -> &[ReactorReason] {
    &worked.feeders[0].reactor.reasons
}

fn advised(worked: &Worked) -> Option<f64> {
    let advised = worked.feeders[0].reactor.advised.as_ref()?;
    Some(advised.percent.to_per_cent())
}

#[test]
fn a_source_ten_times_the_drive_and_of_500_kva_asks_for_three_per_cent() {
    // 60 A: sqrt(3) x 480 x 60 = 49.88 kVA; 500 / 49.88 = 10.02, and 5.75 % / 10.02 = 0.574 %.
    let large = on_source(500.0, 60.0, &[]);
    assert_eq!(
        reasons(&large),
        [ReactorReason::SourcePower, ReactorReason::SourceImpedance]
    );
    assert_near(advised(&large).unwrap(), 3.0);
    assert_eq!(
        only_note(&large.notes, "reactor-advised").grade,
        Grade::Query
    );
}

#[test]
fn one_and_a_half_per_cent_are_advised_where_the_source_impedance_alone_asks() {
    // 61 A: 50.71 kVA; 500 / 50.71 = 9.86, below ten; 5.75 % / 9.86 = 0.583 %, below one.
    let stiff = on_source(500.0, 61.0, &[]);
    assert_eq!(reasons(&stiff), [ReactorReason::SourceImpedance]);
    assert_near(advised(&stiff).unwrap(), 1.5);
    // 499 kVA is no large source, however small the drive.
    let small = on_source(499.0, 5.0, &[]);
    assert_eq!(reasons(&small), [ReactorReason::SourceImpedance]);
    // 500 kVA against 105 A, 87.3 kVA: 5.75 % x 87.3 / 500 = 1.004 %: nothing asks.
    let even = on_source(500.0, 105.0, &[]);
    assert_eq!(reasons(&even), []);
    assert_eq!(advised(&even), None);
}

#[test]
fn a_choke_of_four_per_cent_answers_the_source_and_nothing_else() {
    let choke = |size: f64| (Field::DriveChoke, per_cent(size));
    assert_eq!(reasons(&on_source(500.0, 60.0, &[choke(4.0)])), []);
    assert_eq!(reasons(&on_source(500.0, 60.0, &[choke(3.9)])).len(), 2);
    let [first, ..] = three_drives();
    for (entries, reason) in [
        (
            (Field::Capacitors, choice(Choice::Yes)),
            ReactorReason::Capacitors,
        ),
        ((Field::Surges, choice(Choice::Yes)), ReactorReason::Surges),
        (
            (Field::VoltageUnbalance, per_cent(2.0)),
            ReactorReason::Unbalance,
        ),
    ] {
        let mut drive = first.clone();
        drive.push(choke(5.0));
        let worked = panel_of(&[entries], &[drive]);
        assert_eq!(reasons(&worked), [reason]);
        assert_near(advised(&worked).unwrap(), 3.0);
    }
}

#[test]
fn an_unbalance_of_two_per_cent_asks_and_less_does_not() {
    let [first, ..] = three_drives();
    let at = |unbalance: f64| {
        panel_of(
            &[(Field::VoltageUnbalance, per_cent(unbalance))],
            std::slice::from_ref(&first),
        )
    };
    assert_eq!(reasons(&at(2.0)), [ReactorReason::Unbalance]);
    assert_eq!(reasons(&at(1.9)), []);
}

#[test]
fn an_advised_reactor_changes_no_size_and_no_heat_until_it_is_entered() {
    let [first, ..] = three_drives();
    let one = |entries: &[(Field, Entry)], drive: Vec<(Field, Entry)>| panel_of(entries, &[drive]);
    let without = one(&[], first.clone());
    let advised = one(&[(Field::Capacitors, choice(Choice::Yes))], first.clone());
    let (a, b) = (&without.feeders[0], &advised.feeders[0]);
    assert!(a.reactor.advised.is_none() && b.reactor.advised.is_some());
    assert_eq!(a.ahead, b.ahead);
    assert_eq!(a.behind, b.behind);
    assert_eq!(a.device, b.device);
    assert_eq!(a.heat, b.heat);
    assert_eq!(without.ledger.running, advised.ledger.running);
    // Half a per cent of 29 840 W stands beside the total: 149.2 W.
    assert!(without.ledger.advised_reactors.is_none());
    assert_near(si(advised.ledger.advised_reactors.as_ref().unwrap()), 149.2);
    // Entered, it counts.
    let mut drive = first.clone();
    drive.push((Field::ReactorPercent, per_cent(3.0)));
    let entered = one(&[(Field::Capacitors, choice(Choice::Yes))], drive);
    let more = si(&entered.ledger.running) - si(&without.ledger.running);
    assert_near(more, 149.2);
    assert!(entered.ledger.advised_reactors.is_none());
    assert!(entered.feeders[0].reactor.advised.is_none());
}

#[test]
fn an_entered_reactor_below_the_advice_is_a_query() {
    let [first, ..] = three_drives();
    let mut drive = first;
    drive.push((Field::ReactorPercent, per_cent(1.5)));
    let worked = panel_of(&[(Field::Capacitors, choice(Choice::Yes))], &[drive]);
    assert_eq!(
        only_note(&worked.notes, "reactor-below-advice").grade,
        Grade::Query
    );
    assert!(worked.feeders[0].reactor.entered.is_some());
}

#[test]
fn the_percentage_of_a_reactor_refers_to_the_drives_input_unless_entered() {
    // 0.03 x 480 V / (sqrt(3) x 2 pi x 60 Hz x I): 50 A 0.441063 mH, the motor's 52 A 0.424099 mH, 40 A 0.551329 mH.
    for (more, expected) in [
        (vec![], 0.441_063),
        (
            vec![(Field::ReactorReference, choice(Choice::OfMotorCurrent))],
            0.424_099,
        ),
        (
            vec![
                (Field::ReactorReference, choice(Choice::OfOwnCurrent)),
                (Field::ReactorReferenceCurrent, amperes(40.0)),
            ],
            0.551_329,
        ),
    ] {
        let [mut drive, ..] = three_drives();
        drive.push((Field::ReactorPercent, per_cent(3.0)));
        drive.extend(more);
        let worked = panel_of(&[], &[drive]);
        let reactor = worked.feeders[0].reactor.entered.as_ref().unwrap();
        let inductance: Inductance = reactor.inductance.quantity().unwrap();
        assert_near(inductance.to_millihenries(), expected);
        // It carries the drive's input, whatever the percentage refers to.
        assert_near(si(&reactor.rated_current), 50.0);
    }
    let [mut drive, ..] = three_drives();
    drive.push((Field::ReactorPercent, per_cent(3.0)));
    drive.push((Field::ReactorReference, choice(Choice::OfOwnCurrent)));
    let worked = panel_of(&[], &[drive]);
    assert_eq!(
        only_note(&worked.notes, "reactor-reference-missing").grade,
        Grade::Query
    );
    assert!(worked.feeders[0].reactor.entered.is_none());
}

// --- heat and air ---------------------------------------------------------------------------------------------------

#[test]
fn a_drive_without_data_has_three_per_cent_of_its_motor_and_30_watts() {
    // 0.03 x 29 840 W + 30 W = 925.2 W.
    let assumed = feeder(&[(Field::MotorPower, horsepower(40.0))]);
    let drive = assumed.heat.drive.as_ref().unwrap();
    assert_near(drive.value.to_watts(), 925.2);
    assert_eq!(drive.ink(), Ink::Assumed);
    let entered = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveLoss, watts(810.0)),
    ]);
    let drive = entered.heat.drive.as_ref().unwrap();
    assert_near(drive.value.to_watts(), 810.0);
    assert_eq!(drive.ink(), Ink::Entered);
}

#[test]
fn a_heatsink_outside_carries_its_share_of_the_whole_loss() {
    // 925.2 W x (1 - 0.6) = 370.08 W inside.
    let outside = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::HeatsinkShare, per_cent(60.0)),
    ]);
    assert_near(si(outside.heat.drive_inside.as_ref().unwrap()), 370.08);
}

#[test]
fn a_device_without_data_has_the_limit_of_its_standard_by_the_square_of_current() {
    // Three links of 60 A (7.5 W up to 100 A) at 50 A: 3 x 7.5 x (50/60)^2 = 15.625 W.
    // Three poles of 70 A (15 W up to 100 A) at 50 A: 3 x 15 x (50/70)^2 = 22.9592 W.
    for (device, limit, expected) in [
        (Choice::TimeDelayFuse, 60.0, 15.625),
        (Choice::InverseTimeBreaker, 70.0, 22.959_2),
    ] {
        let sized = feeder(&[
            (Field::MotorPower, horsepower(40.0)),
            (Field::DriveInput, amperes(50.0)),
            (Field::DeviceType, choice(device)),
            (Field::LargestPermitted, amperes(limit)),
        ]);
        assert_amperes(&rating(&sized), limit);
        let loss = sized.heat.device.as_ref().unwrap();
        assert_near(loss.value.to_watts(), expected);
        assert_eq!(loss.ink(), Ink::Assumed);
    }
}

#[test]
fn conductors_inside_are_two_metres_a_run_until_entered() {
    // 50 A: 4 AWG, Table 8 0.308 ohm for 1000 ft: 3 x 50^2 A2 x 0.308 / 304.8 ohm/m x 2 m = 15.1575 W. The run behind lies
    // in the field and warms something else.
    let sized = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
    ]);
    assert_near(si(sized.heat.conductors.as_ref().unwrap()), 15.157_5);
    let longer = feeder(&[
        (Field::MotorPower, horsepower(40.0)),
        (Field::DriveInput, amperes(50.0)),
        (
            Field::Run(Run::Ahead, RunField::Length),
            measured(6.0, Unit::Metre),
        ),
    ]);
    assert_near(si(longer.heat.conductors.as_ref().unwrap()), 3.0 * 15.157_5);
}

#[test]
fn heat_which_cannot_be_worked_is_named_and_not_left_out_in_silence() {
    // A drive and a device whose losses are entered, and a motor known by its current alone: half a per cent of its power
    // is not known.
    let with = |more: &[(Field, Entry)]| {
        let mut entries = vec![
            (Field::Tag, text("P-1")),
            (Field::MotorCurrent, amperes(52.0)),
            (Field::DriveInput, amperes(50.0)),
            (Field::DriveLoss, watts(810.0)),
            (Field::DeviceLoss, watts(15.0)),
        ];
        entries.extend_from_slice(more);
        panel_of(&[], &[entries])
    };
    let reactor = (Field::ReactorPercent, per_cent(3.0));
    assert_no_note(&with(&[]).notes, "ledger-incomplete");
    let loss = (Field::ReactorLoss, watts(120.0));
    assert_no_note(
        &with(&[reactor.clone(), loss.clone()]).notes,
        "ledger-incomplete",
    );
    let unknown = with(std::slice::from_ref(&reactor));
    assert_eq!(
        only_note(&unknown.notes, "ledger-incomplete").grade,
        Grade::Query
    );
    // Its loss is entered, but what its percentage refers to is not: it is no reactor yet, and its loss is missing.
    let own = (Field::ReactorReference, choice(Choice::OfOwnCurrent));
    let unreferred = with(&[reactor, loss, own]);
    assert!(unreferred.feeders[0].heat.reactor.is_none());
    only_note(&unreferred.notes, "ledger-incomplete");
    // A motor known by its current and a drive without data: 3 per cent of an unknown power.
    let bare = panel_of(
        &[],
        &[vec![
            (Field::MotorCurrent, amperes(52.0)),
            (Field::DriveInput, amperes(50.0)),
        ]],
    );
    only_note(&bare.notes, "ledger-incomplete");
}

#[test]
fn a_control_supply_loses_what_its_efficiency_leaves() {
    // 240 W x (1 / 0.88 - 1) = 32.7273 W, 88 per cent being assumed.
    let worked = boxed(&[], &[(Field::SourceOutput, watts(240.0))]);
    assert_near(si(&worked.ledger.running), 32.727_3);
}

/// A free box of 2 x 0.8 x 0.6 m in air of 35 °C, with one source of 300 W unless another is given.
/// A = 1.8 x 2 x (0.8 + 0.6) + 1.4 x 0.8 x 0.6 = 5.712 m2.
fn boxed(more: &[(Field, Entry)], source: &[(Field, Entry)]) -> Worked {
    let mut entries = vec![
        (Field::EnclosureHeight, measured(2.0, Unit::Metre)),
        (Field::EnclosureWidth, measured(0.8, Unit::Metre)),
        (Field::EnclosureDepth, measured(0.6, Unit::Metre)),
        (Field::RoomAmbient, celsius(35.0)),
    ];
    entries.extend_from_slice(more);
    let mut sheet = sheet(&entries, &[]);
    let source = if source.is_empty() {
        vec![(Field::SourceHeat, watts(300.0))]
    } else {
        source.to_vec()
    };
    sheet.sources.push(item(100, &source));
    work_out(&sheet)
}

fn inside(worked: &Worked) -> f64 {
    worked
        .enclosure
        .air
        .inside
        .as_ref()
        .unwrap()
        .value
        .to_celsius()
}

#[test]
fn a_sealed_enclosure_warms_by_heat_over_wall_coefficient_and_effective_surface() {
    // 300 W / (k x 5.712 m2): painted 5.5: 9.54927 K; bare metal and double-walled 2.5: 21.0084 K; plastic 3.5: 15.0060 K.
    for (material, rise) in [
        (Choice::Painted, 9.549_27),
        (Choice::BareMetal, 21.008_4),
        (Choice::DoubleWalled, 21.008_4),
        (Choice::Plastic, 15.006_0),
    ] {
        let worked = boxed(&[(Field::EnclosureMaterial, choice(material))], &[]);
        assert_near(si(worked.enclosure.air.surface.as_ref().unwrap()), 5.712);
        assert_near(si(worked.enclosure.air.sealed_rise.as_ref().unwrap()), rise);
        assert_near(inside(&worked), 35.0 + rise);
    }
    // A coefficient which is entered stands before the material: 300 / (4 x 5.712) = 13.1303 K.
    let own = boxed(
        &[(
            Field::WallCoefficient,
            measured(4.0, Unit::WattPerSquareMetreKelvin),
        )],
        &[],
    );
    assert_near(inside(&own), 48.130_3);
}

#[test]
fn heat_which_stands_by_warms_the_connected_case_alone() {
    let worked = boxed(
        &[],
        &[
            (Field::SourceHeat, watts(300.0)),
            (Field::SourceRunning, choice(Choice::Standby)),
        ],
    );
    assert_near(inside(&worked), 35.0);
    let connected = worked.enclosure.air_connected.inside.as_ref().unwrap();
    assert_near(connected.value.to_celsius(), 44.549_27);
}

#[test]
fn the_heat_of_the_sun_joins_that_inside() {
    // 300 + 200 W: 500 / 31.416 = 15.9155 K; and 500 W for the fans as well.
    let worked = boxed(&[(Field::SunHeat, watts(200.0))], &[]);
    assert_near(inside(&worked), 50.915_5);
    let sun = worked
        .ledger
        .rows
        .iter()
        .find(|row| row.group == LedgerGroup::Sun);
    assert_near(si(&sun.unwrap().running), 200.0);
    let fans = boxed(
        &[
            (Field::SunHeat, watts(200.0)),
            (Field::Cooling, choice(Choice::FilterFans)),
            (Field::InsideLimit, celsius(45.0)),
        ],
        &[],
    );
    // 500 / (1.14550 x 1006 x 10) x 3600 = 156.199 m3/h.
    assert_near(flow_m3h(&fans.enclosure.air.airflow), 156.199);
}

#[test]
fn an_outdoor_sheet_without_the_heat_of_the_sun_is_a_stop() {
    let outdoors = (Field::Surroundings, choice(Choice::Outdoors));
    let without = boxed(std::slice::from_ref(&outdoors), &[]);
    assert_eq!(only_note(&without.notes, "sun-missing").grade, Grade::Stop);
    // None at all, in the shade, can be entered.
    let shaded = boxed(&[outdoors, (Field::SunHeat, watts(0.0))], &[]);
    assert_no_note(&shaded.notes, "sun-missing");
    assert_no_note(&boxed(&[], &[]).notes, "sun-missing");
}

fn flow_m3h(figure: &Option<Arc<Figure>>) -> f64 {
    let flow: ventrail::quantity::AirFlow = figure.as_ref().unwrap().quantity().unwrap();
    flow.to_cubic_metres_per_hour()
}

/// The box with fans which hold 45 °C in air of 35 °C, and 1000 W inside.
fn ventilated(more: &[(Field, Entry)]) -> Worked {
    let mut entries = vec![
        (Field::Cooling, choice(Choice::FilterFans)),
        (Field::InsideLimit, celsius(45.0)),
    ];
    entries.extend_from_slice(more);
    boxed(&entries, &[(Field::SourceHeat, watts(1000.0))])
}

#[test]
fn the_airflow_is_exact_at_the_density_of_the_inlet_and_the_other_views_stand_beside_it() {
    let worked = ventilated(&[]);
    let air = &worked.enclosure.air;
    // rho = 101 325 / (287.05 x 308.15) = 1.14550 kg/m3; 1000 / (1.14550 x 1006 x 10) m3/s = 312.398 m3/h.
    assert_near(si(air.density.as_ref().unwrap()), 1.145_505);
    assert_near(flow_m3h(&air.airflow), 312.398);
    // Credited with 31.416 W/K x 10 K: 685.84 W, 214.255 m3/h. By the rules: 3.1 x 1000 / 10 = 310 m3/h, and
    // 3.16 x 1000 / 18 = 175.556 CFM = 298.271 m3/h.
    assert_near(flow_m3h(&air.airflow_credited), 214.255);
    assert_near(flow_m3h(&air.airflow_metric_rule), 310.0);
    assert_near(flow_m3h(&air.airflow_us_rule), 298.271);
    // The one without credit is held against the fans.
    let total = worked
        .totals
        .iter()
        .find(|total| total.kind == TotalKind::Airflow);
    assert_eq!(total.unwrap().figure, air.airflow);
}

#[test]
fn thin_air_needs_more_flow_for_the_same_heat() {
    // 1900 m: p = 101 325 x (1 - 0.0000225577 x 1900)^5.25588 gives rho 0.909928 kg/m3 at 35 °C: 393.276 m3/h.
    let worked = ventilated(&[(Field::Altitude, measured(1900.0, Unit::Metre))]);
    assert_near(
        si(worked.enclosure.air.density.as_ref().unwrap()),
        0.909_928,
    );
    assert_near(flow_m3h(&worked.enclosure.air.airflow), 393.276);
}

#[test]
fn fans_which_move_less_are_a_stop_and_unknown_ones_a_query() {
    let with = |flow: f64| {
        ventilated(&[(
            Field::InstalledAirflow,
            measured(flow, Unit::CubicMetrePerHour),
        )])
    };
    let short = with(312.0);
    assert_eq!(only_note(&short.notes, "airflow-short").grade, Grade::Stop);
    assert_eq!(verdict(&short, TotalKind::Airflow), Verdict::Beyond);
    let enough = with(313.0);
    assert_no_note(&enough.notes, "airflow-short");
    assert_eq!(verdict(&enough, TotalKind::Airflow), Verdict::Within);
    // Exactly the flow which is needed is enough.
    let needed = si(ventilated(&[]).enclosure.air.airflow.as_ref().unwrap());
    let exact = ventilated(&[(
        Field::InstalledAirflow,
        measured(needed, Unit::CubicMetrePerSecond),
    )]);
    assert_no_note(&exact.notes, "airflow-short");
    let unknown = ventilated(&[]);
    assert_eq!(
        only_note(&unknown.notes, "airflow-unknown").grade,
        Grade::Query
    );
    assert_eq!(verdict(&unknown, TotalKind::Airflow), Verdict::Unknown);
}

#[test]
fn a_limit_which_is_not_above_the_inlet_is_a_stop_and_has_no_airflow() {
    for limit in [35.0, 30.0] {
        let worked = ventilated(&[(Field::InsideLimit, celsius(limit))]);
        assert_eq!(
            only_note(&worked.notes, "inside-not-warmer").grade,
            Grade::Stop
        );
        let air = &worked.enclosure.air;
        assert!(air.airflow.is_none() && air.airflow_credited.is_none());
        assert!(air.airflow_metric_rule.is_none() && air.airflow_us_rule.is_none());
    }
    assert_no_note(&ventilated(&[]).notes, "inside-not-warmer");
}

#[test]
fn a_sealed_enclosure_above_its_limit_is_a_stop() {
    // 44.549 °C against 45 and 44 °C.
    let within = boxed(&[(Field::InsideLimit, celsius(45.0))], &[]);
    assert_eq!(
        verdict(&within, TotalKind::InsideTemperature),
        Verdict::Within
    );
    let beyond = boxed(&[(Field::InsideLimit, celsius(44.0))], &[]);
    assert_eq!(
        verdict(&beyond, TotalKind::InsideTemperature),
        Verdict::Beyond
    );
    assert_eq!(
        only_note(&beyond.notes, "inside-above-limit").grade,
        Grade::Stop
    );
}

/// The ventilated box with one small drive in it.
fn with_a_drive(more: &[(Field, Entry)], drive: &[(Field, Entry)]) -> Worked {
    let mut entries = vec![
        (Field::Cooling, choice(Choice::FilterFans)),
        (Field::RoomAmbient, celsius(35.0)),
        (Field::InsideLimit, celsius(45.0)),
    ];
    entries.extend_from_slice(more);
    let mut of_drive = vec![(Field::MotorPower, horsepower(3.0))];
    of_drive.extend_from_slice(drive);
    panel_of(&entries, &[of_drive])
}

#[test]
fn a_drive_in_air_hotter_than_its_full_current_allows_is_a_query() {
    // 45 °C inside; a drive is taken to be for 40 °C until its limit is entered.
    let hot = with_a_drive(&[], &[]);
    assert_eq!(only_note(&hot.notes, "drive-too-hot").grade, Grade::Query);
    let made_for_it = with_a_drive(&[], &[(Field::DriveAmbientLimit, celsius(45.0))]);
    assert_no_note(&made_for_it.notes, "drive-too-hot");
}

#[test]
fn a_drive_in_a_room_hotter_than_its_limit_is_a_query_before_the_enclosure_is_known() {
    // No measures, so no temperature inside; but nothing cools it below the 41 °C around it.
    let drive = vec![(Field::MotorPower, horsepower(3.0))];
    let hot = panel_of(
        &[(Field::RoomAmbient, celsius(41.0))],
        std::slice::from_ref(&drive),
    );
    assert!(hot.enclosure.air.inside.is_none());
    assert_eq!(only_note(&hot.notes, "drive-too-hot").grade, Grade::Query);
    let cool = panel_of(&[(Field::RoomAmbient, celsius(40.0))], &[drive]);
    assert_no_note(&cool.notes, "drive-too-hot");
}

#[test]
fn a_drive_with_its_heatsink_outside_goes_by_the_hotter_of_both_airs() {
    // 46 °C around. At 47 °C inside the inside governs. A limit of 44 °C, which no fan holds in such air, leaves it to the
    // outside.
    let drive = [
        (Field::DriveAmbientLimit, celsius(45.0)),
        (Field::HeatsinkShare, per_cent(60.0)),
    ];
    let around = |inside: f64| {
        with_a_drive(
            &[
                (Field::RoomAmbient, celsius(46.0)),
                (Field::InsideLimit, celsius(inside)),
            ],
            &drive,
        )
    };
    for (inside, governing) in [(47.0, 47.0), (44.0, 46.0)] {
        let worked = around(inside);
        let note = only_note(&worked.notes, "drive-too-hot");
        let NoteKind::DriveTooHot { air, .. } = note.kind else {
            panic!("{note:?}");
        };
        assert_near(air.to_celsius(), governing);
    }
}

#[test]
fn a_drive_higher_than_its_full_current_allows_is_a_query() {
    // 1000 m until its limit is entered.
    let at = |metres: f64, drive: &[(Field, Entry)]| {
        with_a_drive(&[(Field::Altitude, measured(metres, Unit::Metre))], drive)
    };
    let high = at(1001.0, &[]);
    assert_eq!(only_note(&high.notes, "drive-too-high").grade, Grade::Query);
    assert_no_note(&at(1000.0, &[]).notes, "drive-too-high");
    let limit = (Field::DriveAltitudeLimit, measured(2000.0, Unit::Metre));
    assert_no_note(&at(1900.0, &[limit]).notes, "drive-too-high");
}

// --- what is filled in ------------------------------------------------------------------------------------------------

#[test]
fn what_is_filled_in_is_what_is_stated() {
    let mut sheet = Sheet {
        feeders: vec![item(0, &[(Field::MotorPower, horsepower(10.0))])],
        sources: vec![item(1, &[(Field::SourceOutput, watts(100.0))])],
        next_id: 2,
        ..Sheet::default()
    };
    let volts = volts(480.0);
    sheet
        .record
        .set(Field::SupplyVoltage, volts)
        .expect("an entry which fits");
    let assumed = |holder: Holder| -> Vec<(Field, AssumedValue)> {
        work_out(&sheet)
            .assumptions
            .into_iter()
            .filter(|assumption| assumption.place.holder == holder)
            .map(|assumption| (assumption.place.field, assumption.value))
            .collect()
    };
    let chosen = |field, answer| (field, AssumedValue::Choice(answer));
    let amount = |field, amount: Amount| (field, AssumedValue::Amount(amount));
    let run = |run: Run, part: RunField| Field::Run(run, part);
    let of_run = |which: Run, insulation: Choice, conduit: Choice| {
        [
            chosen(run(which, RunField::Metal), Choice::Copper),
            amount(run(which, RunField::Sets), Amount::Count(1)),
            chosen(run(which, RunField::Insulation), insulation),
            chosen(run(which, RunField::Terminal), Choice::Unmarked),
            chosen(run(which, RunField::Conduit), conduit),
            amount(
                run(which, RunField::PowerFactor),
                Ratio::per_cent(85.0).into(),
            ),
        ]
    };
    let in_the_field = |which: Run| {
        [
            amount(
                run(which, RunField::Ambient),
                Temperature::celsius(40.0).into(),
            ),
            amount(run(which, RunField::Carrying), Amount::Count(3)),
        ]
    };
    let mut of_sheet = vec![
        amount(Field::RoomAmbient, Temperature::celsius(40.0).into()),
        amount(Field::SupplyFrequency, Frequency::hertz(60.0).into()),
        amount(Field::TransformerImpedance, Ratio::per_cent(5.75).into()),
        chosen(Field::ImpedanceKind, Choice::Nameplate),
        amount(Field::VoltageUnbalance, Ratio::per_cent(1.0).into()),
        chosen(Field::Capacitors, Choice::No),
        chosen(Field::Surges, Choice::No),
        amount(Field::Altitude, Length::metres(0.0).into()),
        chosen(Field::MainType, Choice::InverseTimeBreaker),
        chosen(Field::EnclosureMaterial, Choice::Painted),
        chosen(Field::Mounting, Choice::Free),
        chosen(Field::Surroundings, Choice::Indoors),
        chosen(Field::Cooling, Choice::Sealed),
        amount(Field::InsideLimit, Temperature::celsius(50.0).into()),
    ];
    // What lets more fault current through: the incoming raceway is not magnetic.
    of_sheet.extend(of_run(
        Run::Incoming,
        Choice::Insulation75,
        Choice::PvcConduit,
    ));
    of_sheet.extend(in_the_field(Run::Incoming));
    let mut of_feeder = vec![
        chosen(Field::Running, Choice::Together),
        amount(Field::HeatsinkShare, Ratio::of_one(0.0).into()),
        amount(Field::DriveChoke, Ratio::of_one(0.0).into()),
        amount(Field::DriveAmbientLimit, Temperature::celsius(40.0).into()),
        amount(Field::DriveAltitudeLimit, Length::metres(1000.0).into()),
        chosen(Field::DeviceType, Choice::TimeDelayFuse),
        chosen(run(Run::Ahead, RunField::Place), Choice::Inside),
        amount(
            run(Run::Ahead, RunField::Length),
            Length::metres(2.0).into(),
        ),
        chosen(run(Run::Behind, RunField::Place), Choice::Field),
    ];
    of_feeder.extend(of_run(
        Run::Ahead,
        Choice::Insulation90,
        Choice::SteelConduit,
    ));
    of_feeder.extend(of_run(
        Run::Behind,
        Choice::Insulation75,
        Choice::SteelConduit,
    ));
    of_feeder.extend(in_the_field(Run::Behind));
    let of_source = vec![
        amount(Field::SourceEfficiency, Ratio::per_cent(88.0).into()),
        chosen(Field::SourceRunning, Choice::Together),
    ];
    for (holder, stated) in [
        (Holder::Sheet, of_sheet),
        (Holder::Feeder(HolderId(0)), of_feeder),
        (Holder::Source(HolderId(1)), of_source),
    ] {
        let assumed = assumed(holder);
        for wanted in &stated {
            assert!(assumed.contains(wanted), "{wanted:?} is not in {assumed:?}");
        }
        // What follows from other values is proven where it is worked: inputs and losses.
        let by_rule = [
            Field::DriveInput,
            Field::DriveLoss,
            Field::DeviceLoss,
            Field::MainLoss,
        ];
        let fixed = [Field::Basis, Field::Edition, Field::Units];
        for (field, value) in &assumed {
            let is_stated = stated.iter().any(|(known, _)| known == field);
            assert!(
                is_stated || by_rule.contains(field) || fixed.contains(field),
                "{field:?}: {value:?}"
            );
        }
    }
}

// --- what the tests share -------------------------------------------------------------------------------------------

/// A panel on 480 V in air of 40 °C, with `more` entries.
fn sheet(more: &[(Field, Entry)], feeders: &[Vec<(Field, Entry)>]) -> Sheet {
    let mut record = Record::default();
    let base = [
        (Field::SupplyVoltage, volts(480.0)),
        (Field::RoomAmbient, celsius(40.0)),
    ];
    for (field, entry) in base.iter().chain(more) {
        record
            .set(*field, entry.clone())
            .expect("an entry which fits");
    }
    let ids = 0_u32..;
    Sheet {
        record,
        feeders: feeders
            .iter()
            .zip(ids)
            .map(|(entries, id)| item(id, entries))
            .collect(),
        sources: Vec::new(),
        next_id: 1_000,
    }
}

fn item(id: u32, entries: &[(Field, Entry)]) -> Arc<Item> {
    let mut record = Record::default();
    for (field, entry) in entries {
        record
            .set(*field, entry.clone())
            .expect("an entry which fits");
    }
    Arc::new(Item {
        id: HolderId(id),
        record,
    })
}

fn panel_of(more: &[(Field, Entry)], feeders: &[Vec<(Field, Entry)>]) -> Worked {
    work_out(&sheet(more, feeders))
}

fn panel(more: &[(Field, Entry)], feeders: &[&[(Field, Entry)]]) -> Worked {
    let feeders: Vec<Vec<(Field, Entry)>> =
        feeders.iter().map(|entries| entries.to_vec()).collect();
    panel_of(more, &feeders)
}

fn feeder(entries: &[(Field, Entry)]) -> Arc<WorkedFeeder> {
    Arc::clone(&panel(&[], &[entries]).feeders[0])
}

fn rating(feeder: &WorkedFeeder) -> Option<Given<Current>> {
    feeder.device.as_ref()?.rating.clone()
}

fn grounding(conductors: &Conductors) -> Option<WireSize> {
    match conductors.grounding.as_ref()?.value {
        Amount::Size(size) => Some(size),
        _ => None,
    }
}

fn verdict(worked: &Worked, kind: TotalKind) -> Verdict {
    let total = worked.totals.iter().find(|total| total.kind == kind);
    total.expect("every total is there").verdict
}

/// A run in the field: copper with 75 °C insulation and terminals, at so many degrees among so many conductors.
fn field_run(ambient: f64, carrying: u32) -> RunInput {
    RunInput {
        run: Run::Behind,
        surrounding: Surrounding::Field {
            ambient: entered(Temperature::celsius(ambient)),
            carrying: entered(carrying),
        },
        metal: entered(Metal::Copper),
        sets: entered(1),
        size: None,
        insulation: entered(Column::C75),
        terminal: entered(Terminal::Marked75),
        conduit: entered(Conduit::Steel),
        length: Some(entered(Length::metres(10.0))),
        power_factor: entered(Ratio::of_one(0.85)),
    }
}

/// A run inside: copper with 90 °C insulation at unmarked terminals, with the air inside where it is known.
fn inside_run(air: Option<f64>) -> RunInput {
    RunInput {
        surrounding: Surrounding::Inside {
            air: air.map(Temperature::celsius),
        },
        insulation: entered(Column::C90),
        terminal: entered(Terminal::Unmarked),
        ..field_run(30.0, 3)
    }
}

fn sized(run: &RunInput, amperes: f64) -> (Conductors, Vec<MarginNote>) {
    let current = Given::entered(Field::MotorCurrent, Current::amperes(amperes));
    let demand = demand_of(&rules::OUTPUT_AMPACITY, "I_m", &current);
    let voltage = Given::entered(Field::SupplyVoltage, Voltage::volts(480.0));
    let mut notes = Vec::new();
    let sized = size_run(run, &demand, &voltage, &mut notes).expect("a demand in amperes");
    (sized, notes)
}

fn entered<T>(value: T) -> Given<T> {
    Given::entered(Field::Run(Run::Behind, RunField::Place), value)
}

/// The one figure by a rule below another.
fn below(figure: &Arc<Figure>, id: &str) -> Arc<Figure> {
    let mut waiting = vec![Arc::clone(figure)];
    while let Some(figure) = waiting.pop() {
        if figure.rule.id == id {
            return figure;
        }
        waiting.extend(figure.terms.iter().filter_map(|term| match &term.origin {
            Origin::Figure(below) => Some(Arc::clone(below)),
            _ => None,
        }));
    }
    panic!("nothing by {id}");
}

fn notes_of<'a>(notes: &'a [MarginNote], id: &'a str) -> impl Iterator<Item = &'a MarginNote> {
    notes.iter().filter(move |note| note.kind.id() == id)
}

#[track_caller]
fn only_note<'a>(notes: &'a [MarginNote], id: &'a str) -> &'a MarginNote {
    let found: Vec<&MarginNote> = notes_of(notes, id).collect();
    assert_eq!(found.len(), 1, "{id} in {notes:?}");
    found[0]
}

#[track_caller]
fn assert_no_note(notes: &[MarginNote], id: &str) {
    assert_eq!(notes_of(notes, id).count(), 0, "{id} in {notes:?}");
}

fn si(figure: &Figure) -> f64 {
    match figure.value {
        Amount::Measured { si, .. } => si,
        other => panic!("{other:?} is no quantity"),
    }
}

/// Numbers worked by hand carry six digits.
const SIX_DIGITS: f64 = 5e-6;

#[track_caller]
fn assert_near(got: f64, by_hand: f64) {
    assert!(
        (got - by_hand).abs() <= SIX_DIGITS * by_hand.abs(),
        "got {got}, by hand {by_hand}"
    );
}

#[track_caller]
fn assert_amperes(got: &Option<Given<Current>>, by_hand: f64) {
    let got = got.as_ref().expect("a current");
    assert_near(got.value.to_amperes(), by_hand);
}

fn measured(number: f64, unit: Unit) -> Entry {
    Entry::Measured(Measured {
        number,
        unit,
        text: format!("{number}"),
    })
}

fn horsepower(number: f64) -> Entry {
    measured(number, Unit::Horsepower)
}

fn amperes(number: f64) -> Entry {
    measured(number, Unit::Ampere)
}

fn kiloamperes(number: f64) -> Entry {
    measured(number, Unit::Kiloampere)
}

fn volts(number: f64) -> Entry {
    measured(number, Unit::Volt)
}

fn watts(number: f64) -> Entry {
    measured(number, Unit::Watt)
}

fn celsius(number: f64) -> Entry {
    measured(number, Unit::Celsius)
}

fn feet(number: f64) -> Entry {
    measured(number, Unit::Foot)
}

fn per_cent(number: f64) -> Entry {
    measured(number, Unit::PerCent)
}

fn choice(choice: Choice) -> Entry {
    Entry::Choice(choice)
}

fn text(text: &str) -> Entry {
    Entry::Text(text.to_owned())
}
