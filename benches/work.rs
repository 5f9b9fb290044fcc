//! How long a sheet takes to work out, from the eleven feeders of a usual panel to a thousand, and again after one edit.
//!
//! `cargo bench --no-default-features`. The edit is the usual one: another motor on one feeder in the middle.

#![allow(
    clippy::expect_used,
    clippy::unwrap_used,
    reason = "a benchmark stops at the first surprise"
)]

use divan::{Bencher, black_box};
use std::sync::Arc;
use ventrail::quantity::Unit;
use ventrail::sheet::{Choice, Entry, Item, Measured, Record, Sheet};
use ventrail::work::{work_again, work_out};
use ventrail::working::{Field, HolderId, Run, RunField};

const FEEDERS: [u32; 3] = [11, 60, 1_000];

fn main() {
    divan::main();
}

/// Fans hold the limit inside: the sizes are worked for one band of air.
#[divan::bench(args = FEEDERS, max_time = 3)]
fn work_out_with_fans(bencher: Bencher<'_, '_>, feeders: u32) {
    let sheet = panel(feeders, Choice::FilterFans);
    bencher.bench(|| work_out(black_box(&sheet)));
}

/// A sealed enclosure: air and sizes are settled, band by band.
#[divan::bench(args = FEEDERS, max_time = 3)]
fn work_out_sealed(bencher: Bencher<'_, '_>, feeders: u32) {
    let sheet = panel(feeders, Choice::Sealed);
    bencher.bench(|| work_out(black_box(&sheet)));
}

#[divan::bench(args = FEEDERS, max_time = 3)]
fn work_again_with_fans_after_one_edit(bencher: Bencher<'_, '_>, feeders: u32) {
    let (edited, before) = edited(feeders, Choice::FilterFans);
    bencher.bench(|| work_again(black_box(&edited), black_box(&before)));
}

#[divan::bench(args = FEEDERS, max_time = 3)]
fn work_again_sealed_after_one_edit(bencher: Bencher<'_, '_>, feeders: u32) {
    let (edited, before) = edited(feeders, Choice::Sealed);
    bencher.bench(|| work_again(black_box(&edited), black_box(&before)));
}

fn edited(feeders: u32, cooling: Choice) -> (Sheet, ventrail::work::Worked) {
    let sheet = panel(feeders, cooling);
    let before = work_out(&sheet);
    let mut edited = sheet;
    let middle = edited.feeders.len() / 2;
    let item = edited.feeders.get_mut(middle).expect("a feeder");
    set(
        &mut Arc::make_mut(item).record,
        Field::MotorPower,
        measured(50.0, Unit::Horsepower),
    );
    (edited, before)
}

/// A panel of mixed drives at 480 V, in an enclosure which grows with them.
fn panel(feeders: u32, cooling: Choice) -> Sheet {
    let mut record = Record::default();
    let count = f64::from(feeders);
    for (field, entry) in [
        (Field::SupplyVoltage, measured(480.0, Unit::Volt)),
        (
            Field::TransformerPower,
            measured(1_000.0, Unit::KilovoltAmpere),
        ),
        (Field::TransformerImpedance, measured(5.75, Unit::PerCent)),
        (Field::RoomAmbient, measured(35.0, Unit::Celsius)),
        (Field::EnclosureHeight, measured(2.0, Unit::Metre)),
        (
            Field::EnclosureWidth,
            measured((0.8 * count).min(20.0), Unit::Metre),
        ),
        (Field::EnclosureDepth, measured(0.6, Unit::Metre)),
        (Field::Cooling, Entry::Choice(cooling)),
        (Field::InsideLimit, measured(45.0, Unit::Celsius)),
        (
            Field::Run(Run::Incoming, RunField::Length),
            measured(40.0, Unit::Foot),
        ),
        (Field::Run(Run::Incoming, RunField::Sets), Entry::Count(4)),
    ] {
        set(&mut record, field, entry);
    }
    Sheet {
        record,
        feeders: (0..feeders).map(feeder).collect(),
        sources: Vec::new(),
        next_id: feeders,
    }
}

fn feeder(number: u32) -> Arc<Item> {
    let powers = [3.0, 5.0, 7.5, 10.0, 15.0, 20.0, 25.0, 30.0, 40.0];
    let turn = usize::try_from(number).unwrap() % powers.len();
    let power = powers.get(turn).copied().unwrap();
    let mut record = Record::default();
    for (field, entry) in [
        (Field::Tag, Entry::Text(format!("P-{number}"))),
        (Field::MotorPower, measured(power, Unit::Horsepower)),
        (Field::ShortCircuitRating, measured(65.0, Unit::Kiloampere)),
        (
            Field::Run(Run::Ahead, RunField::Length),
            measured(6.0, Unit::Foot),
        ),
        (
            Field::Run(Run::Behind, RunField::Length),
            measured(180.0, Unit::Foot),
        ),
    ] {
        set(&mut record, field, entry);
    }
    Arc::new(Item {
        id: HolderId(number),
        record,
    })
}

fn set(record: &mut Record, field: Field, entry: Entry) {
    record.set(field, entry).expect("an entry which fits");
}

fn measured(number: f64, unit: Unit) -> Entry {
    Entry::Measured(Measured {
        number,
        unit,
        text: format!("{number}"),
    })
}
