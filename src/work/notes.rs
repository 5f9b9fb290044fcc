//! What the sheet as a whole must be told: standing-by feeders, missing heat, repeated tags, tables from memory, drives
//! in air too hot or too thin.

use super::feeder::Feeder;
use super::panel::tag_of;
use crate::assume::SheetInputs;
use crate::math::reaches;
use crate::quantity::{Current, Ratio, Temperature, WireSize};
use crate::sheet::{Item, Sheet};
use crate::sizing::conductor::cells_from_memory;
use crate::sizing::panel::IncomingCircuit;
use crate::tables::DeviceType;
use crate::tables::device_losses::{breaker_pole, fuse_link};
use crate::working::{
    Field, Given, Grade, Holder, MarginNote, MemoryTable, NoteKind, Run, RunField,
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
    let standing_by = tags(feeders, |feeder| !feeder.worked.is_running);
    if !standing_by.is_empty() {
        tell(
            Grade::Note,
            Field::Running,
            NoteKind::StandingBy { tags: standing_by },
        );
    }
    let has_load = |feeder: &Feeder| {
        feeder.worked.motor_current.is_some() || feeder.worked.drive_input.is_some()
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
    let without_heat = tags(feeders, |feeder| {
        let heat = &feeder.worked.heat;
        let has_reactor = feeder
            .inputs
            .reactor
            .as_ref()
            .is_some_and(|percent| percent.value > Ratio::of_one(0.0));
        has_load(feeder)
            && (heat.drive.is_none()
                || heat.device.is_none()
                || (has_reactor && heat.reactor.is_none()))
    });
    if !without_heat.is_empty() {
        tell(
            Grade::Query,
            Field::DriveLoss,
            NoteKind::LedgerIncomplete { tags: without_heat },
        );
    }
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
            Field::ReactorPercent,
            NoteKind::SeveralDrives { drives },
        );
    }
    notes.extend(repeated_tags(feeders));
    notes.extend(memory_notes(inputs, feeders, incoming));
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

/// One `query` for each table some cells of which are known from memory, naming the rows which took part.
fn memory_notes(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    incoming: &IncomingCircuit,
) -> Vec<MarginNote> {
    let mut notes = Vec::new();
    let mut inside: Vec<_> = feeders
        .iter()
        .flat_map(|feeder| feeder.worked.inside_sizes())
        .collect();
    inside.sort_unstable();
    inside.dedup();
    let mut field: Vec<_> = feeders
        .iter()
        .flat_map(|feeder| feeder.worked.runs())
        .chain(&incoming.conductors)
        .filter_map(cells_from_memory)
        .filter(|(is_inside, _)| !is_inside)
        .map(|(_, size)| size)
        .collect();
    field.sort_unstable();
    field.dedup();
    let numbers =
        |sizes: Vec<WireSize>| sizes.iter().map(|size| size.number().to_owned()).collect();
    let mut tell = |table, rows: Vec<String>, place| {
        if !rows.is_empty() {
            notes.push(MarginNote::new(
                Grade::Query,
                place,
                NoteKind::TableFromMemory { table, rows },
            ));
        }
    };
    tell(
        MemoryTable::InsideAmpacity,
        numbers(inside),
        Field::Run(Run::Ahead, RunField::Size),
    );
    tell(
        MemoryTable::FieldAmpacity,
        numbers(field),
        Field::Run(Run::Behind, RunField::Size),
    );
    let (breakers, fuses) = assumed_device_ratings(inputs, feeders, incoming);
    tell(MemoryTable::BreakerLoss, breakers, Field::DeviceLoss);
    tell(MemoryTable::FuseLoss, fuses, Field::DeviceLoss);
    notes
}

/// Ratings of breakers and of fuses whose loss was assumed from a limit.
fn assumed_device_ratings(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    incoming: &IncomingCircuit,
) -> (Vec<String>, Vec<String>) {
    let of_feeders = feeders.iter().filter_map(|feeder| {
        let loss = feeder.worked.heat.device.as_ref()?;
        let device = feeder.worked.device.as_ref()?;
        (!loss.is_entered()).then_some((device.device.value, device.rating.as_ref()?.value))
    });
    let of_main = incoming
        .main
        .as_ref()
        .filter(|_| inputs.main_loss.is_none())
        .and_then(|main| Some((inputs.main.value, main.rating.as_ref()?.value)))
        .filter(|(device, rating)| match device {
            DeviceType::InverseTimeBreaker => breaker_pole(*rating).is_some(),
            _ => fuse_link(*rating).is_some(),
        });
    let mut ratings: Vec<(DeviceType, Current)> = of_feeders.chain(of_main).collect();
    ratings.sort_by(|a, b| a.1.to_amperes().total_cmp(&b.1.to_amperes()));
    ratings.dedup();
    let named = |wanted: fn(DeviceType) -> bool| {
        let mut names: Vec<String> = ratings
            .iter()
            .filter(|(device, _)| wanted(*device))
            .map(|(_, rating)| format!("{}", rating.to_amperes()))
            .collect();
        names.dedup();
        names
    };
    (
        named(|device| device == DeviceType::InverseTimeBreaker),
        named(|device| device != DeviceType::InverseTimeBreaker),
    )
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

/// Several queries about one table become one which names all rows.
pub(super) fn merge_memory_notes(notes: Vec<MarginNote>) -> Vec<MarginNote> {
    let mut merged: Vec<MarginNote> = Vec::with_capacity(notes.len());
    for note in notes {
        let NoteKind::TableFromMemory { table, rows } = &note.kind else {
            merged.push(note);
            continue;
        };
        let earlier = merged
            .iter_mut()
            .find_map(|earlier| match &mut earlier.kind {
                NoteKind::TableFromMemory {
                    table: its_table,
                    rows: its_rows,
                } if its_table == table => Some(its_rows),
                _ => None,
            });
        match earlier {
            Some(its_rows) => its_rows.extend(
                rows.iter()
                    .filter(|row| !its_rows.contains(row))
                    .cloned()
                    .collect::<Vec<_>>(),
            ),
            None => merged.push(note),
        }
    }
    merged
}

/// Stops first; within a grade the sheet's own notes, then the feeders' in their order, then the sources'.
pub(super) fn in_order(mut notes: Vec<MarginNote>, sheet: &Sheet) -> Vec<MarginNote> {
    let place_of = |items: &[Arc<Item>], id| {
        items
            .iter()
            .position(|item| item.id == id)
            .unwrap_or(usize::MAX)
    };
    notes.sort_by_key(|note| {
        let (group, position) = match note.place.holder {
            Holder::Sheet => (0, 0),
            Holder::Feeder(id) => (1, place_of(&sheet.feeders, id)),
            Holder::Source(id) => (2, place_of(&sheet.sources, id)),
        };
        (note.grade, group, position)
    });
    notes
}
