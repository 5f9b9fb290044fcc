//! The whole sheet: feeders, the loop between air and sizes, panel, enclosure, totals, notes.

use super::enclosure::{band_edges, band_of, enclosure_of, note_enclosure};
use super::feeder::{Feeder, work_feeder};
use super::ledger::ledger_of;
use super::panel::{Ratings, fault_of, incoming_of, main_loss, ratings_of, tag_of};
use super::{Ledger, Total, TotalKind, Verdict, Worked, WorkedEnclosure, WorkedSource};
use crate::assume::{SheetInputs, Site, SourceInputs, site, source};
use crate::math::reaches;
use crate::quantity::{Current, Power, Temperature};
use crate::sheet::{Item, Sheet};
use crate::sizing::air::Air;
use crate::sizing::fault::Fault;
use crate::sizing::heat::source_heat;
use crate::sizing::panel::IncomingCircuit;
use crate::sizing::rules;
use crate::tables::DeviceType;
use crate::working::{
    Amount, Field, Figure, Given, Grade, Holder, MarginNote, MemoryTable, NoteKind, Run, RunField,
    Term,
};
use std::collections::BTreeMap;
use std::sync::Arc;

/// Works out a sheet: total and pure, any sheet gives a worked sheet.
pub fn work_out(sheet: &Sheet) -> Worked {
    work_with(sheet, &Memory::default())
}

/// As [`work_out`], but takes over from `before` what cannot have changed: a feeder is worked again only where it, the
/// site, or the band of the air inside changed. Gives exactly what [`work_out`] gives.
pub fn work_again(sheet: &Sheet, before: &Worked) -> Worked {
    work_with(sheet, &before.memory)
}

/// Feeders as they were worked, with everything their result depends on.
#[derive(Debug, Clone, Default)]
pub(super) struct Memory {
    site: Option<Arc<Site>>,
    feeders: BTreeMap<u32, (Arc<Item>, Feeder)>,
}

// What is remembered decides only how fast a sheet is worked, never what comes out.
impl PartialEq for Memory {
    fn eq(&self, _: &Self) -> bool {
        true
    }
}

impl Memory {
    fn recall(
        &self,
        item: &Arc<Item>,
        site: &Site,
        air_band: Option<Temperature>,
    ) -> Option<Feeder> {
        if self.site.as_deref() != Some(site) {
            return None;
        }
        let (known, feeder) = self.feeders.get(&item.id.0)?;
        let is_same_item = Arc::ptr_eq(known, item) || known == item;
        (is_same_item && feeder.air_band == air_band).then(|| feeder.clone())
    }
}

fn work_with(sheet: &Sheet, memory: &Memory) -> Worked {
    let inputs = site(sheet);
    let sources: Vec<(WorkedSource, SourceInputs)> =
        sheet.sources.iter().map(|item| work_source(item)).collect();
    let worked_sources: Vec<WorkedSource> =
        sources.iter().map(|(worked, _)| worked.clone()).collect();
    let settled = settle(sheet, &inputs, &worked_sources, memory);
    let mut notes = settled.notes;
    let fault = fault_of(&inputs, &settled.incoming, &mut notes);
    let ratings = ratings_of(&inputs, &settled.feeders, &fault, &mut notes);
    let heat: Power = settled
        .ledger
        .running
        .quantity()
        .unwrap_or(Power::watts(0.0));
    note_enclosure(&inputs, &settled.enclosure, heat, &mut notes);
    note_sheet(&inputs, &settled.feeders, &settled.incoming, &mut notes);
    note_drives(
        &inputs,
        &settled.feeders,
        settled.enclosure.air.inside.as_ref(),
        &mut notes,
    );
    for (worked, source_inputs) in &sources {
        if worked.heat.is_none() {
            let note =
                MarginNote::new(Grade::Query, Field::SourceHeat, NoteKind::SourceHeatUnknown);
            notes.push(note.held_by(Holder::Source(worked.id)));
        }
        debug_assert_eq!(worked.name, source_inputs.name);
    }
    notes.extend(
        settled
            .feeders
            .iter()
            .flat_map(|feeder| feeder.worked.notes.clone()),
    );
    let mut assumptions = inputs.assumptions.clone();
    assumptions.extend(
        settled
            .feeders
            .iter()
            .flat_map(|feeder| feeder.worked.assumptions.clone()),
    );
    assumptions.extend(
        sources
            .iter()
            .flat_map(|(_, source)| source.assumptions.clone()),
    );
    let totals = totals_of(&Findings {
        inputs: &inputs,
        ledger: &settled.ledger,
        enclosure: &settled.enclosure,
        incoming: &settled.incoming,
        fault: &fault,
        ratings: &ratings,
    });
    Worked {
        feeders: settled
            .feeders
            .iter()
            .map(|feeder| Arc::clone(&feeder.worked))
            .collect(),
        sources: worked_sources,
        incoming: settled.incoming,
        fault,
        lowest_rating: ratings.lowest,
        ledger: settled.ledger,
        enclosure: settled.enclosure,
        totals,
        assumptions,
        notes: in_order(merge_memory_notes(notes), sheet),
        memory: Memory {
            site: Some(Arc::new(inputs.site)),
            feeders: sheet
                .feeders
                .iter()
                .zip(settled.feeders)
                .map(|(item, feeder)| (item.id.0, (Arc::clone(item), feeder)))
                .collect(),
        },
    }
}

fn work_source(item: &Item) -> (WorkedSource, SourceInputs) {
    let inputs = source(item);
    let worked = WorkedSource {
        id: item.id,
        name: inputs.name.clone(),
        is_running: inputs.is_running,
        heat: source_heat(
            inputs.heat.clone(),
            inputs.output.as_ref(),
            &inputs.efficiency,
        ),
        current: inputs.current.clone(),
    };
    (worked, inputs)
}

/// Feeders, panel and enclosure which agree on the air inside.
struct Settled {
    feeders: Vec<Feeder>,
    incoming: IncomingCircuit,
    ledger: Ledger,
    enclosure: WorkedEnclosure,
    notes: Vec<MarginNote>,
}

/// Solves the loop between the air inside and the sizes inside.
///
/// Sizes, and so the heat, are the same for the whole of a band of air temperature, and hotter air never gives smaller
/// wires: so the bands are tried from the coolest up, and the first one whose heat leads into it, or below it, is the
/// solution. Where it leads below, no temperature fits exactly: the larger sizes and the warmer end, the edge between
/// the two bands, are kept and said. Exact, with at most one turn for each band.
fn settle(
    sheet: &Sheet,
    inputs: &SheetInputs,
    sources: &[WorkedSource],
    memory: &Memory,
) -> Settled {
    let mut cooler_edge = None;
    for edge in band_edges() {
        let mut settled = work_for(sheet, inputs, sources, Some(edge), memory);
        let Some(inside) = settled
            .enclosure
            .air
            .inside
            .as_ref()
            .map(|inside| inside.value)
        else {
            return work_for(sheet, inputs, sources, None, memory);
        };
        if reaches(edge.to_kelvin(), inside.to_kelvin()) {
            if let Some(cooler) = cooler_edge.filter(|cooler: &Temperature| inside < *cooler) {
                keep_warmer_end(&mut settled, cooler);
            }
            return settled;
        }
        // A limit held by fans does not depend on the heat: its band is the solution.
        if settled.enclosure.is_ventilated {
            return work_for(sheet, inputs, sources, Some(band_of(inside)), memory);
        }
        cooler_edge = Some(edge);
    }
    // Hotter than the last band: the hottest band's sizes would not hold, so the air itself is handed on.
    let hottest = work_for(sheet, inputs, sources, band_edges().last(), memory);
    let inside = hottest
        .enclosure
        .air
        .inside
        .as_ref()
        .map(|inside| inside.value);
    work_for(sheet, inputs, sources, inside, memory)
}

fn keep_warmer_end(settled: &mut Settled, edge: Temperature) {
    let air = &mut settled.enclosure.air;
    let exact = air.inside.as_ref().map(|inside| inside.term("by heat"));
    let mut terms: Vec<Term> = exact.into_iter().collect();
    terms.push(Term::constant("edge", edge));
    let figure = Arc::new(rules::AIR_LOOP_END.figure(edge, terms));
    air.inside = Given::from_figure(&figure);
    settled.notes.push(
        MarginNote::new(
            Grade::Note,
            Field::InsideLimit,
            NoteKind::LoopKeptWarmerEnd { air: edge },
        )
        .about(&figure),
    );
}

fn work_for(
    sheet: &Sheet,
    inputs: &SheetInputs,
    sources: &[WorkedSource],
    air_band: Option<Temperature>,
    memory: &Memory,
) -> Settled {
    let feeders: Vec<Feeder> = sheet
        .feeders
        .iter()
        .map(|item| {
            memory
                .recall(item, &inputs.site, air_band)
                .unwrap_or_else(|| work_feeder(item, &inputs.site, air_band))
        })
        .collect();
    let mut notes = Vec::new();
    let incoming = incoming_of(inputs, &feeders, sources, &mut notes);
    let main = main_loss(inputs, &incoming, &mut notes);
    let ledger = ledger_of(
        &feeders,
        sources,
        main.as_ref(),
        inputs.enclosure.sun.as_ref(),
    );
    let enclosure = enclosure_of(inputs, &ledger);
    Settled {
        feeders,
        incoming,
        ledger,
        enclosure,
        notes,
    }
}

fn note_sheet(
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
    let without_device = tags(feeders, |feeder| {
        feeder.worked.is_running && has_load(feeder) && feeder.load.is_none()
    });
    if !without_device.is_empty() && incoming.main.is_some() {
        tell(
            Grade::Query,
            Field::MainType,
            NoteKind::MainIncomplete {
                tags: without_device,
            },
        );
    }
    let without_heat = tags(feeders, |feeder| {
        has_load(feeder)
            && (feeder.worked.heat.drive.is_none() || feeder.worked.heat.device.is_none())
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
        .filter_map(crate::sizing::conductor::cells_from_memory)
        .filter(|(is_inside, _)| !is_inside)
        .map(|(_, size)| size)
        .collect();
    field.sort_unstable();
    field.dedup();
    let numbers = |sizes: Vec<crate::quantity::WireSize>| {
        sizes.iter().map(|size| size.number().to_owned()).collect()
    };
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
            DeviceType::InverseTimeBreaker => {
                crate::tables::device_losses::breaker_pole(*rating).is_some()
            }
            _ => crate::tables::device_losses::fuse_link(*rating).is_some(),
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
fn note_drives(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    inside: Option<&Given<Temperature>>,
    notes: &mut Vec<MarginNote>,
) {
    for feeder in feeders.iter().filter(|feeder| feeder.load.is_some()) {
        let holder = Holder::Feeder(feeder.worked.id);
        let limits = &feeder.inputs;
        if let Some(air) = governing_air(inputs, feeder, inside)
            && !reaches(limits.ambient_limit.value.to_kelvin(), air.to_kelvin())
        {
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

/// With a heatsink through the wall the hotter of inside and outside governs; else the inside.
fn governing_air(
    inputs: &SheetInputs,
    feeder: &Feeder,
    inside: Option<&Given<Temperature>>,
) -> Option<Temperature> {
    let inside = inside?.value;
    let outside = inputs.site.ambient.value;
    let has_outside_heatsink = feeder.inputs.heatsink_share.value.to_one() > 0.0;
    Some(if has_outside_heatsink && outside > inside {
        outside
    } else {
        inside
    })
}

/// Several queries about one table become one which names all rows.
fn merge_memory_notes(notes: Vec<MarginNote>) -> Vec<MarginNote> {
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
fn in_order(mut notes: Vec<MarginNote>, sheet: &Sheet) -> Vec<MarginNote> {
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

/// Everything the totals are read from.
struct Findings<'a> {
    inputs: &'a SheetInputs,
    ledger: &'a Ledger,
    enclosure: &'a WorkedEnclosure,
    incoming: &'a IncomingCircuit,
    fault: &'a Fault,
    ratings: &'a Ratings,
}

fn totals_of(found: &Findings<'_>) -> Vec<Total> {
    vec![
        heat_total(found),
        inside_total(found),
        airflow_total(found),
        current_total(found),
        main_total(found),
        fault_total(found),
    ]
}

fn amount_of(figure: Option<&Arc<Figure>>) -> Option<Amount> {
    figure.map(|figure| figure.value)
}

fn heat_total(found: &Findings<'_>) -> Total {
    Total {
        kind: TotalKind::Heat,
        running: Some(found.ledger.running.value),
        connected: Some(found.ledger.connected.value),
        figure: Some(Arc::clone(&found.ledger.running)),
        limit: None,
        verdict: Verdict::NoLimit,
    }
}

fn inside_total(found: &Findings<'_>) -> Total {
    let limit = found.enclosure.limit.value;
    let inside_of = |air: &Air| air.inside.as_ref().map(|inside| inside.value);
    let running = inside_of(&found.enclosure.air);
    let verdict = match running {
        None => Verdict::Unknown,
        // With fans the limit is what they are to hold: the verdict stands at the airflow.
        Some(_) if found.enclosure.is_ventilated => Verdict::NoLimit,
        Some(inside) if reaches(limit.to_kelvin(), inside.to_kelvin()) => Verdict::Within,
        Some(_) => Verdict::Beyond,
    };
    Total {
        kind: TotalKind::InsideTemperature,
        running: running.map(Amount::from),
        connected: inside_of(&found.enclosure.air_connected).map(Amount::from),
        figure: found
            .enclosure
            .air
            .sealed_inside
            .clone()
            .filter(|_| !found.enclosure.is_ventilated),
        limit: Some(limit.into()),
        verdict,
    }
}

fn airflow_total(found: &Findings<'_>) -> Total {
    let needed = found
        .enclosure
        .air
        .airflow
        .clone()
        .filter(|_| found.enclosure.is_ventilated);
    let connected = found
        .enclosure
        .air_connected
        .airflow
        .clone()
        .filter(|_| found.enclosure.is_ventilated);
    let installed = found.inputs.enclosure.installed_airflow.as_ref();
    let verdict = match (&needed, installed) {
        (Some(needed), Some(installed)) => match needed.quantity::<crate::quantity::AirFlow>() {
            Some(needed) if installed.value < needed => Verdict::Beyond,
            Some(_) => Verdict::Within,
            None => Verdict::Unknown,
        },
        _ if found.enclosure.is_ventilated => Verdict::Unknown,
        _ => Verdict::NoLimit,
    };
    Total {
        kind: TotalKind::Airflow,
        running: amount_of(needed.as_ref()),
        connected: amount_of(connected.as_ref()),
        figure: needed,
        limit: installed.map(|installed| installed.value.into()),
        verdict,
    }
}

fn current_total(found: &Findings<'_>) -> Total {
    let carries = found
        .incoming
        .conductors
        .as_ref()
        .and_then(|conductors| conductors.ampacity.clone());
    let required = found
        .incoming
        .conductors
        .as_ref()
        .and_then(|conductors| conductors.required.quantity::<Current>());
    let verdict = match (&carries, required) {
        (Some(carries), Some(required)) => match carries.quantity::<Current>() {
            Some(carries) if reaches(carries.to_amperes(), required.to_amperes()) => {
                Verdict::Within
            }
            Some(_) => Verdict::Beyond,
            None => Verdict::Unknown,
        },
        _ => Verdict::Unknown,
    };
    Total {
        kind: TotalKind::IncomingCurrent,
        running: amount_of(found.incoming.running.as_ref()),
        connected: amount_of(found.incoming.connected.as_ref()),
        figure: found.incoming.running.clone(),
        limit: amount_of(carries.as_ref()),
        verdict,
    }
}

fn main_total(found: &Findings<'_>) -> Total {
    let main = found.incoming.main.as_ref();
    let rating = main.and_then(|main| main.rating.clone());
    let largest = main.and_then(|main| main.largest.clone());
    let verdict = match (
        &rating,
        largest
            .as_ref()
            .and_then(|figure| figure.quantity::<Current>()),
    ) {
        (Some(rating), Some(largest))
            if reaches(largest.to_amperes(), rating.value.to_amperes()) =>
        {
            Verdict::Within
        }
        (Some(_), Some(_)) => Verdict::Beyond,
        _ => Verdict::Unknown,
    };
    Total {
        kind: TotalKind::MainDevice,
        running: rating.map(|rating| rating.value.into()),
        connected: None,
        figure: largest.clone(),
        limit: amount_of(largest.as_ref()),
        verdict,
    }
}

fn fault_total(found: &Findings<'_>) -> Total {
    let fault = found.fault.at_panel.as_ref();
    let lowest = found.ratings.lowest.as_ref().map(|(rating, _)| *rating);
    let verdict = match (fault, lowest) {
        (Some(fault), Some(rating)) if rating < fault.value => Verdict::Beyond,
        (Some(_), Some(_)) if found.ratings.is_complete => Verdict::Within,
        _ => Verdict::Unknown,
    };
    Total {
        kind: TotalKind::FaultCurrent,
        running: fault.map(|fault| fault.value.into()),
        connected: None,
        figure: fault.and_then(|fault| match &fault.origin {
            crate::working::Origin::Figure(figure) => Some(Arc::clone(figure)),
            _ => None,
        }),
        limit: lowest.map(Amount::from),
        verdict,
    }
}
