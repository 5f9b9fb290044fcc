//! Random sheets and documents for property tests, drawn from the ranges of `sheet::spec`.
//!
//! Include it with `#[path = "common/random_sheets.rs"] mod random_sheets;` and use in `proptest!`:
//!
//! - [`any_sheet`]: everything a sheet can hold. From empty to every field filled; limits of each range, values
//!   between them, and values of the trade, in every unit that fits; zero to six feeders, zero to three sources.
//! - [`ordinary_sheet`]: sheets which work out: supply, motors and run lengths are there and are of the trade, the
//!   rest is sometimes there. Nearly every feeder gets its sizes.
//! - [`any_document`]: a sheet of either sort with drafts and answers.
//! - [`any_record`], [`any_entry`], [`ordinary_entry`]: the parts, for tests which need one holder or one field.
//!
//! Every value made here was taken by `Record::set`, so all of them are sheets which the core may meet.

#![allow(
    dead_code,
    reason = "each test file that includes this one uses its own part of it"
)]
#![allow(
    clippy::expect_used,
    reason = "a strategy which makes an impossible entry is a mistake of this file, to be seen at once"
)]

use proptest::collection::vec;
use proptest::prelude::*;
use proptest::sample::{Index, select, subsequence};
use std::collections::BTreeSet;
use std::sync::Arc;
use ventrail::math::power;
use ventrail::quantity::{Kind, Unit, WireSize};
use ventrail::sheet::{
    Document, Entry, Home, Item, Measured, NoteRef, Record, Shape, Sheet, fields_of, spec,
};
use ventrail::working::{Field, Holder, HolderId, Place, Run, RunField};

/// Any document which edits can lead to: a sheet with drafts and answers at places that exist.
pub fn any_document() -> impl Strategy<Value = Document> {
    let draft = (any::<Index>(), any::<Index>(), any_text(60));
    let answer = (any::<Index>(), any::<Index>(), note_kind(), any_text(60));
    (
        prop_oneof![any_sheet(), ordinary_sheet()],
        vec(draft, 0..4),
        vec(answer, 0..4),
    )
        .prop_map(|(sheet, drafts, answers)| {
            let holders = holders_of(&sheet);
            let place = |which: &Index, field: &Index| {
                let (holder, home) = *which.get(&holders);
                let field = *field.get(&fields_of(home));
                Place { holder, field }
            };
            Document {
                drafts: drafts
                    .iter()
                    .map(|(which, field, text)| (place(which, field), text.clone()))
                    .collect(),
                answers: answers
                    .iter()
                    .map(|(which, field, kind, text)| {
                        let note = NoteRef {
                            place: place(which, field),
                            kind: kind.clone(),
                        };
                        (note, text.clone())
                    })
                    .collect(),
                sheet,
            }
        })
}

/// Any sheet at all.
pub fn any_sheet() -> impl Strategy<Value = Sheet> {
    sheet_of(
        any_record(Home::Sheet),
        any_record(Home::Feeder),
        any_record(Home::Source),
    )
}

/// A sheet with supply, motors and run lengths as the trade has them.
pub fn ordinary_sheet() -> impl Strategy<Value = Sheet> {
    sheet_of(
        ordinary_record(Home::Sheet),
        ordinary_record(Home::Feeder),
        ordinary_record(Home::Source),
    )
}

fn sheet_of(
    of_sheet: BoxedStrategy<Record>,
    of_feeder: BoxedStrategy<Record>,
    of_source: BoxedStrategy<Record>,
) -> impl Strategy<Value = Sheet> {
    // Identities are neither in order nor without gaps, as after moves and deletions.
    let ids = Just((0..12).collect::<Vec<u32>>()).prop_shuffle();
    (of_sheet, vec(of_feeder, 0..=6), vec(of_source, 0..=3), ids).prop_map(
        |(record, feeders, sources, ids)| {
            let mut ids = ids.into_iter().map(HolderId);
            let mut item = |record| {
                let id = ids.next().expect("more identities than holders");
                Arc::new(Item { id, record })
            };
            Sheet {
                record,
                feeders: feeders.into_iter().map(&mut item).collect(),
                sources: sources.into_iter().map(&mut item).collect(),
                next_id: 12,
            }
        },
    )
}

/// Any record of a kind of holder: empty, thinly or well filled, or with every field.
pub fn any_record(home: Home) -> BoxedStrategy<Record> {
    prop_oneof![
        1 => Just(Record::default()),
        3 => filled(home, |field| optional(0.3, any_entry(field))),
        3 => filled(home, |field| optional(0.8, any_entry(field))),
        1 => filled(home, |field| optional(1.0, any_entry(field))),
    ]
    .boxed()
}

/// A record of the trade: see [`ordinary_sheet`].
pub fn ordinary_record(home: Home) -> BoxedStrategy<Record> {
    filled(home, |field| {
        let share = if is_needed(field) { 1.0 } else { 0.25 };
        optional(share, ordinary_entry(field))
    })
}

fn filled(
    home: Home,
    entry_of: impl Fn(Field) -> BoxedStrategy<Option<Entry>>,
) -> BoxedStrategy<Record> {
    let fields = fields_of(home);
    let entries: Vec<_> = fields.iter().map(|field| entry_of(*field)).collect();
    entries
        .prop_map(move |entries| {
            let mut record = Record::default();
            for (field, entry) in fields.iter().zip(entries) {
                if let Some(entry) = entry {
                    record
                        .set(*field, entry)
                        .expect("random entries fit their fields");
                }
            }
            record
        })
        .boxed()
}

/// The entry in `share` of the cases; a share of one is asked for apart, because `weighted` takes none.
fn optional(share: f64, entry: BoxedStrategy<Entry>) -> BoxedStrategy<Option<Entry>> {
    if share < 1.0 {
        proptest::option::weighted(share, entry).boxed()
    } else {
        entry.prop_map(Some).boxed()
    }
}

/// Any entry which `field` takes, its limits among them.
pub fn any_entry(field: Field) -> BoxedStrategy<Entry> {
    match spec(field).shape {
        Shape::Text { longest } => any_text(longest).prop_map(Entry::Text).boxed(),
        Shape::Measured { kind, least, most } => prop_oneof![
            1 => measured(Just(least), kind),
            1 => measured(Just(most), kind),
            3 => measured(least..=most, kind),
            2 => measured(evenly_over_decades(least, most), kind),
            3 => ordinary_entry(field),
        ]
        .boxed(),
        Shape::Count { least, most } => prop_oneof![
            1 => Just(least),
            1 => Just(most),
            2 => least..=most,
        ]
        .prop_map(Entry::Count)
        .boxed(),
        Shape::Choice(offered) => select(offered).prop_map(Entry::Choice).boxed(),
        Shape::Choices(offered) => subsequence(offered, 1..=offered.len())
            .prop_map(|chosen| Entry::Choices(BTreeSet::from_iter(chosen)))
            .boxed(),
        Shape::Size => select(&WireSize::ALL[..]).prop_map(Entry::Size).boxed(),
    }
}

/// An entry of `field` as the trade has it; any entry where this file knows no usual values.
pub fn ordinary_entry(field: Field) -> BoxedStrategy<Entry> {
    match spec(field).shape {
        Shape::Measured { kind, least, most } => {
            let (numbers, unit) = usual(field);
            if numbers.is_empty() {
                return measured(least..=most, kind);
            }
            select(numbers)
                .prop_map(move |number| typed(number, unit, format!("{number}")))
                .boxed()
        }
        Shape::Text { longest } => usual_text(field, longest).prop_map(Entry::Text).boxed(),
        Shape::Count { least, .. } => (least..=least + 3).prop_map(Entry::Count).boxed(),
        _ => any_entry(field),
    }
}

/// Whether [`ordinary_sheet`] always holds the field.
fn is_needed(field: Field) -> bool {
    use Field::*;
    matches!(
        field,
        SupplyVoltage
            | TransformerPower
            | TransformerImpedance
            | RoomAmbient
            | EnclosureHeight
            | EnclosureWidth
            | EnclosureDepth
            | InsideLimit
            | Tag
            | MotorPower
            | SourceName
            | SourceHeat
            | Run(_, RunField::Length)
    )
}

/// Usual values of a measured field, in the unit in which they are usual.
fn usual(field: Field) -> (&'static [f64], Unit) {
    use self::Run as R;
    use Field::*;
    match field {
        SupplyVoltage => (&[480.0, 480.0, 208.0, 240.0, 600.0, 460.0], Unit::Volt),
        SupplyFrequency => (&[60.0, 60.0, 50.0], Unit::Hertz),
        TransformerPower => (&[112.5, 500.0, 750.0, 1000.0, 2500.0], Unit::KilovoltAmpere),
        TransformerImpedance => (&[2.0, 3.5, 5.75, 7.0], Unit::PerCent),
        VoltageUnbalance => (&[0.0, 0.5, 1.0, 2.0, 3.0], Unit::PerCent),
        SourceFaultCurrent => (&[5.0, 22.0, 42.0, 65.0], Unit::Kiloampere),
        ShortCircuitRating | MainShortCircuitRating => {
            (&[5.0, 10.0, 65.0, 100.0], Unit::Kiloampere)
        }
        Altitude => (&[0.0, 500.0, 3300.0, 6200.0], Unit::Foot),
        DriveAltitudeLimit => (&[1000.0, 2000.0], Unit::Metre),
        RoomAmbient => (&[20.0, 30.0, 35.0, 40.0], Unit::Celsius),
        InsideLimit | DriveAmbientLimit => (&[40.0, 45.0, 50.0], Unit::Celsius),
        EnclosureHeight => (&[60.0, 72.0, 90.0], Unit::Inch),
        EnclosureWidth => (&[36.0, 60.0, 72.0], Unit::Inch),
        EnclosureDepth => (&[12.0, 18.0, 24.0], Unit::Inch),
        WallCoefficient => (&[3.0, 5.5, 12.0], Unit::WattPerSquareMetreKelvin),
        InstalledAirflow => (&[100.0, 500.0, 1100.0], Unit::CubicFootPerMinute),
        MotorPower => (
            &[
                0.5, 3.0, 5.0, 7.5, 10.0, 15.0, 20.0, 25.0, 30.0, 40.0, 75.0, 200.0,
            ],
            Unit::Horsepower,
        ),
        MotorCurrent | DriveInput => (&[1.1, 4.8, 7.6, 14.0, 27.0, 52.0, 96.0], Unit::Ampere),
        DriveLoss => (&[60.0, 190.0, 410.0, 1200.0], Unit::Watt),
        DeviceLoss | ReactorLoss => (&[0.0, 9.0, 45.0, 130.0], Unit::Watt),
        HeatsinkShare => (&[0.0, 60.0, 85.0], Unit::PerCent),
        DriveChoke => (&[0.0, 3.0, 5.0], Unit::PerCent),
        ReactorPercent => (&[1.5, 3.0, 5.0], Unit::PerCent),
        MainRating => (&[60.0, 225.0, 400.0, 800.0], Unit::Ampere),
        LargestPermitted | DeviceRating => (&[15.0, 30.0, 60.0, 125.0, 250.0], Unit::Ampere),
        SourceHeat => (&[15.0, 60.0, 240.0], Unit::Watt),
        Run(R::Ahead, RunField::Length) => (&[2.0, 6.0, 10.0], Unit::Foot),
        Run(_, RunField::Length) => (&[40.0, 120.0, 350.0], Unit::Foot),
        Run(_, RunField::Ambient) => (&[20.0, 30.0, 40.0, 45.0], Unit::Celsius),
        Run(_, RunField::PowerFactor) => (&[80.0, 85.0, 95.0], Unit::PerCent),
        _ => (&[], Unit::One),
    }
}

/// A quantity in any unit which measures its kind, from its value in SI.
fn measured(si: impl Strategy<Value = f64> + 'static, kind: Kind) -> BoxedStrategy<Entry> {
    let units: Vec<Unit> = Unit::ALL
        .into_iter()
        .filter(|unit| unit.measures(kind))
        .collect();
    (si, select(units), any::<bool>())
        .prop_map(|(si, unit, is_bare)| {
            let number = unit.from_si(si);
            let text = if is_bare {
                format!("{number}")
            } else {
                format!("{number} {unit:?}")
            };
            typed(number, unit, text)
        })
        .boxed()
}

fn typed(number: f64, unit: Unit, text: String) -> Entry {
    Entry::Measured(Measured { number, unit, text })
}

/// Values whose order of magnitude is what varies; the lower tenth of the range where it begins at or below zero.
fn evenly_over_decades(least: f64, most: f64) -> impl Strategy<Value = f64> {
    (0.0..=1.0).prop_map(move |share: f64| {
        if least > 0.0 {
            (least * power(most / least, share)).clamp(least, most)
        } else {
            least + (most - least) * 0.1 * share
        }
    })
}

/// Text of any characters, from one to `longest` of them.
pub fn any_text(longest: usize) -> BoxedStrategy<String> {
    let text = |length: std::ops::RangeInclusive<usize>| {
        vec(any_character(), length).prop_map(String::from_iter)
    };
    prop_oneof![
        8 => text(1..=longest.min(12)),
        1 => text(longest..=longest),
    ]
    .boxed()
}

fn any_character() -> impl Strategy<Value = char> {
    prop_oneof![
        6 => proptest::char::range(' ', '~'),
        2 => select(vec!['"', '\\', '/', '\u{a0}', '\u{2028}', '\u{2212}', '²', 'é', '電', '😀']),
        1 => any::<char>(),
    ]
}

/// Text with repetitions, so that two feeders sometimes carry one tag.
fn usual_text(field: Field, longest: usize) -> BoxedStrategy<String> {
    match field {
        Field::Tag => select(vec!["P-1", "P-2", "P-3", "C-1", "C-2", "M-1", "F-7"])
            .prop_map(str::to_owned)
            .boxed(),
        _ => any_text(longest.min(24)),
    }
}

fn note_kind() -> impl Strategy<Value = String> {
    select(vec![
        "drive-input-assumed",
        "reactor-advised",
        "sun-missing",
        "a-kind-of-a-later-version",
    ])
    .prop_map(str::to_owned)
}

fn holders_of(sheet: &Sheet) -> Vec<(Holder, Home)> {
    let feeders = sheet
        .feeders
        .iter()
        .map(|item| (Holder::Feeder(item.id), Home::Feeder));
    let sources = sheet
        .sources
        .iter()
        .map(|item| (Holder::Source(item.id), Home::Source));
    std::iter::once((Holder::Sheet, Home::Sheet))
        .chain(feeders)
        .chain(sources)
        .collect()
}
