//! What the sheet as a whole must be told: standing-by feeders, missing heat, repeated tags, tables from memory, drives
//! in air too hot or too thin.

use super::feeder::Feeder;
use super::panel::tag_of;
use crate::assume::SheetInputs;
use crate::math::reaches;
use crate::quantity::{Current, Ratio, Temperature};
use crate::sheet::{Item, Sheet};
use crate::sizing::conductor::{Conductors, Surrounding, cells_from_memory};
use crate::sizing::panel::IncomingCircuit;
use crate::sizing::reactor::ANSWERING_CHOKE;
use crate::tables::DeviceType;
use crate::tables::device_losses::{breaker_pole, fuse_link};
use crate::tables::nec_chapter_9::area;
use crate::working::{
    Field, Given, Grade, Holder, HolderId, MarginNote, MemoryTable, NoteKind, Place, RunField,
};
use std::collections::BTreeMap;
use std::sync::Arc;

/// Findings about the sheet as a whole.
pub(super) fn note_sheet(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    incoming: &IncomingCircuit,
    notes: &mut Vec<MarginNote>,
) {
    let mut tell = |grade, field, kind| notes.push(MarginNote::new(grade, field, kind));
    if inputs.site.supply.is_none() && !feeders.is_empty() {
        tell(
            Grade::Query,
            Field::SupplyVoltage,
            NoteKind::SupplyVoltageMissing,
        );
    }
    let has_load = |feeder: &Feeder| {
        let inputs = &feeder.inputs;
        inputs.motor_power.is_some()
            || inputs.motor_current.is_some()
            || inputs.drive_input.is_some()
    };
    let uncounted = tags(feeders, |feeder| {
        let is_counted = feeder
            .load
            .as_ref()
            .is_some_and(|load| load.branch.is_some());
        feeder.worked.is_running && has_load(feeder) && !is_counted
    });
    if !uncounted.is_empty() {
        tell(
            Grade::Query,
            Field::MainType,
            NoteKind::MainIncomplete { tags: uncounted },
        );
    }
    let is_without_heat = |feeder: &Feeder| {
        let heat = &feeder.worked.heat;
        let has_reactor = feeder
            .inputs
            .reactor
            .as_ref()
            .is_some_and(|percent| percent.value > Ratio::of_one(0.0));
        has_load(feeder)
            && (heat.drive.is_none()
                || heat.device.is_none()
                || feeder.worked.runs().any(is_inside_without_heat)
                || (has_reactor && heat.reactor.is_none()))
    };
    let drives = u32::try_from(
        feeders
            .iter()
            .filter(|feeder| feeder.load.is_some())
            .count(),
    )
    .unwrap_or(u32::MAX);
    if drives > 1 {
        tell(
            Grade::Note,
            Field::SupplyVoltage,
            NoteKind::SeveralDrives { drives },
        );
    }
    notes.extend(at_first(
        feeders,
        |feeder| !feeder.worked.is_running,
        (Grade::Note, Field::Running),
        |tags| NoteKind::StandingBy { tags },
    ));
    notes.extend(at_first(
        feeders,
        is_without_heat,
        (Grade::Query, Field::DriveLoss),
        |tags| NoteKind::LedgerIncomplete { tags },
    ));
    notes.extend(at_first(
        feeders,
        |feeder| stands_by_larger(feeder, feeders, incoming),
        (Grade::Query, Field::Running),
        |tags| NoteKind::StandbyLarger { tags },
    ));
    if has_unknown_source(inputs, feeders) {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::TransformerPower,
            NoteKind::SourceUnknown,
        ));
    }
    notes.extend(repeated_tags(feeders));
    notes.extend(memory_notes(inputs, feeders, incoming));
}

/// Whether a feeder stands by which would ask for more than the one it could replace: its drive takes more than the
/// largest which runs, or its branch device is above the main device.
fn stands_by_larger(feeder: &Feeder, feeders: &[Feeder], incoming: &IncomingCircuit) -> bool {
    let Some(load) = feeder.load.as_ref().filter(|load| !load.is_running) else {
        return false;
    };
    let largest_running = feeders
        .iter()
        .filter_map(|other| other.load.as_ref().filter(|other| other.is_running))
        .map(|other| other.drive_input.value)
        .fold(Current::amperes(0.0), |a, b| if b > a { b } else { a });
    let main = incoming.main.as_ref().and_then(|main| main.rating.as_ref());
    let branch = feeder
        .worked
        .device
        .as_ref()
        .and_then(|device| device.rating.as_ref());
    let is_above_main = main
        .zip(branch)
        .is_some_and(|(main, branch)| branch.value > main.value);
    load.drive_input.value > largest_running || is_above_main
}

/// Whether reasons of practice for a reactor stay open: no transformer is entered, and some drive has no choke which
/// would answer them.
fn has_unknown_source(inputs: &SheetInputs, feeders: &[Feeder]) -> bool {
    inputs.transformer.is_none()
        && inputs.site.supply.is_some()
        && feeders
            .iter()
            .any(|feeder| feeder.load.is_some() && feeder.inputs.choke.value < ANSWERING_CHOKE)
}

/// Whether a run inside could not be sized, so that its heat is missing.
fn is_inside_without_heat(conductors: &Conductors) -> bool {
    matches!(conductors.input.surrounding, Surrounding::Inside { .. }) && conductors.heat.is_none()
}

/// One note about several feeders, at the first of them; `None` where there are none.
fn at_first(
    feeders: &[Feeder],
    wanted: impl Fn(&Feeder) -> bool,
    (grade, field): (Grade, Field),
    kind: impl FnOnce(Vec<String>) -> NoteKind,
) -> Option<MarginNote> {
    let first = feeders.iter().find(|feeder| wanted(feeder))?;
    let note = MarginNote::new(grade, field, kind(tags(feeders, wanted)));
    Some(note.held_by(Holder::Feeder(first.worked.id)))
}

fn tags(feeders: &[Feeder], wanted: impl Fn(&Feeder) -> bool) -> Vec<String> {
    feeders
        .iter()
        .filter(|feeder| wanted(feeder))
        .map(|feeder| tag_of(&feeder.worked))
        .collect()
}

fn repeated_tags(feeders: &[Feeder]) -> Vec<MarginNote> {
    let mut first_seen = BTreeMap::new();
    let mut notes = Vec::new();
    for feeder in feeders
        .iter()
        .filter(|feeder| !feeder.worked.tag.is_empty())
    {
        let tag = &feeder.worked.tag;
        if first_seen.insert(tag.clone(), feeder.worked.id).is_some() {
            let kind = NoteKind::TagRepeated { tag: tag.clone() };
            notes.push(
                MarginNote::new(Grade::Query, Field::Tag, kind)
                    .held_by(Holder::Feeder(feeder.worked.id)),
            );
        }
    }
    notes
}

/// A row of a table known from memory, and the place where it first took part.
struct RowFromMemory {
    table: MemoryTable,
    row: String,
    /// Rows are named in this order, smallest first.
    order: f64,
    place: Place,
}

/// One `query` for each table some cells of which are known from memory, naming the rows which took part.
fn memory_notes(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    incoming: &IncomingCircuit,
) -> Vec<MarginNote> {
    let of_feeders = feeders.iter().flat_map(rows_of_feeder);
    let of_panel = incoming
        .conductors
        .iter()
        .filter_map(|conductors| ampacity_row_of(conductors, Holder::Sheet))
        .chain(main_row(inputs, incoming));
    let rows: Vec<RowFromMemory> = of_feeders.chain(of_panel).collect();
    [
        MemoryTable::InsideAmpacity,
        MemoryTable::FieldAmpacity,
        MemoryTable::BreakerLoss,
        MemoryTable::FuseLoss,
    ]
    .into_iter()
    .filter_map(|table| memory_note(table, &rows))
    .collect()
}

fn memory_note(table: MemoryTable, rows: &[RowFromMemory]) -> Option<MarginNote> {
    let mut of_table: Vec<&RowFromMemory> = rows.iter().filter(|row| row.table == table).collect();
    let first = *of_table.first()?;
    of_table.sort_by(|a, b| a.order.total_cmp(&b.order));
    of_table.dedup_by(|a, b| a.row == b.row);
    let names = of_table.iter().map(|row| row.row.clone()).collect();
    let kind = NoteKind::TableFromMemory { table, rows: names };
    Some(MarginNote::new(Grade::Query, first.place.field, kind).held_by(first.place.holder))
}

fn rows_of_feeder(feeder: &Feeder) -> impl Iterator<Item = RowFromMemory> + '_ {
    let holder = Holder::Feeder(feeder.worked.id);
    feeder
        .worked
        .runs()
        .filter_map(move |conductors| ampacity_row_of(conductors, holder))
        .chain(device_row(feeder, holder))
}

fn ampacity_row_of(conductors: &Conductors, holder: Holder) -> Option<RowFromMemory> {
    let (is_inside, size) = cells_from_memory(conductors)?;
    let table = if is_inside {
        MemoryTable::InsideAmpacity
    } else {
        MemoryTable::FieldAmpacity
    };
    Some(RowFromMemory {
        table,
        row: size.number().to_owned(),
        order: area(size).to_circular_mils(),
        place: Place {
            holder,
            field: Field::Run(conductors.input.run, RunField::Size),
        },
    })
}

/// The row by which the loss of a branch device was assumed.
fn device_row(feeder: &Feeder, holder: Holder) -> Option<RowFromMemory> {
    let loss = feeder.worked.heat.device.as_ref()?;
    let device = feeder.worked.device.as_ref()?;
    let rating = device.rating.as_ref()?.value;
    let place = Place {
        holder,
        field: Field::DeviceLoss,
    };
    (!loss.is_entered()).then(|| loss_row(device.device.value, rating, place))
}

/// The row by which the loss of the main device was assumed.
fn main_row(inputs: &SheetInputs, incoming: &IncomingCircuit) -> Option<RowFromMemory> {
    let rating = incoming.main.as_ref()?.rating.as_ref()?.value;
    let device = inputs.main.value;
    let is_in_table = match device {
        DeviceType::InverseTimeBreaker => breaker_pole(rating).is_some(),
        _ => fuse_link(rating).is_some(),
    };
    let place = Place {
        holder: Holder::Sheet,
        field: Field::MainLoss,
    };
    (is_in_table && inputs.main_loss.is_none()).then(|| loss_row(device, rating, place))
}

fn loss_row(device: DeviceType, rating: Current, place: Place) -> RowFromMemory {
    RowFromMemory {
        table: match device {
            DeviceType::InverseTimeBreaker => MemoryTable::BreakerLoss,
            _ => MemoryTable::FuseLoss,
        },
        row: format!("{}", rating.to_amperes()),
        order: rating.to_amperes(),
        place,
    }
}

/// Drives which stand in hotter air or higher than their full current allows: a `query` until derating is worked.
pub(super) fn note_drives(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    inside: Option<&Given<Temperature>>,
    notes: &mut Vec<MarginNote>,
) {
    for feeder in feeders.iter().filter(|feeder| feeder.load.is_some()) {
        let holder = Holder::Feeder(feeder.worked.id);
        let limits = &feeder.inputs;
        let air = governing_air(inputs, feeder, inside);
        if !reaches(limits.ambient_limit.value.to_kelvin(), air.to_kelvin()) {
            let kind = NoteKind::DriveTooHot {
                air,
                limit: limits.ambient_limit.value,
            };
            notes.push(
                MarginNote::new(Grade::Query, Field::DriveAmbientLimit, kind).held_by(holder),
            );
        }
        let altitude = inputs.altitude.value;
        if !reaches(
            limits.altitude_limit.value.to_metres(),
            altitude.to_metres(),
        ) {
            let kind = NoteKind::DriveTooHigh {
                altitude,
                limit: limits.altitude_limit.value,
            };
            notes.push(
                MarginNote::new(Grade::Query, Field::DriveAltitudeLimit, kind).held_by(holder),
            );
        }
    }
}

/// With a heatsink through the wall the hotter of inside and outside governs; else the inside. Where the inside is not
/// known yet the outside stands for it: nothing cools the enclosure below the air around it.
fn governing_air(
    inputs: &SheetInputs,
    feeder: &Feeder,
    inside: Option<&Given<Temperature>>,
) -> Temperature {
    let outside = inputs.site.ambient.value;
    let inside = inside.map_or(outside, |inside| inside.value);
    let has_outside_heatsink = feeder.inputs.heatsink_share.value.to_one() > 0.0;
    if has_outside_heatsink && outside > inside {
        outside
    } else {
        inside
    }
}

/// Stops first; within a grade the sheet's own notes, then the feeders' in their order, then the sources'.
pub(super) fn in_order(mut notes: Vec<MarginNote>, sheet: &Sheet) -> Vec<MarginNote> {
    let places = |items: &[Arc<Item>]| -> BTreeMap<HolderId, usize> {
        items
            .iter()
            .enumerate()
            .map(|(position, item)| (item.id, position))
            .collect()
    };
    let (feeders, sources) = (places(&sheet.feeders), places(&sheet.sources));
    notes.sort_by_key(|note| {
        let (group, position) = match note.place.holder {
            Holder::Sheet => (0, None),
            Holder::Feeder(id) => (1, feeders.get(&id).copied()),
            Holder::Source(id) => (2, sources.get(&id).copied()),
        };
        (note.grade, group, position)
    });
    notes
}
