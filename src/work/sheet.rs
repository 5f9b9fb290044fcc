//! The whole sheet: feeders, the loop between air and sizes, panel and enclosure.

use super::enclosure::{band_edges, band_of, enclosure_of, note_enclosure};
use super::feeder::{Feeder, assumed_by_rule, work_feeder};
use super::ledger::ledger_of;
use super::notes::{in_order, note_drives, note_sheet};
use super::panel::{fault_of, incoming_of, main_loss, ratings_of};
use super::totals::{Findings, Gaps, totals_of};
use super::{Ledger, Worked, WorkedEnclosure, WorkedSource};
use crate::assume::{SheetInputs, Site, SourceInputs, site, source};
use crate::math::reaches;
use crate::quantity::{Current, Power, Temperature};
use crate::sheet::{Item, Sheet};
use crate::sizing::air::Air;
use crate::sizing::heat::source_heat;
use crate::sizing::panel::IncomingCircuit;
use crate::sizing::rules;
use crate::working::{Field, Figure, Given, Grade, Holder, MarginNote, NoteKind, Term};
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
    /// The band of the air inside for which the feeders were worked.
    air_band: Option<Temperature>,
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
    let mut fault_notes = Vec::new();
    let fault = fault_of(&inputs, &settled.incoming, &mut fault_notes);
    // A sheet without feeders has nothing yet which could meet a fault.
    notes.extend(
        fault_notes
            .into_iter()
            .filter(|_| !sheet.feeders.is_empty()),
    );
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
    notes.extend(source_notes(&worked_sources));
    notes.extend(
        settled
            .feeders
            .iter()
            .flat_map(|feeder| feeder.worked.notes.clone()),
    );
    let mut assumptions = inputs.assumptions.clone();
    let main_loss = settled.main_loss.as_ref();
    assumptions.extend(assumed_by_rule(Holder::Sheet, Field::MainLoss, main_loss));
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
        gaps: Gaps::of(&notes),
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
        notes: in_order(notes, sheet),
        memory: Memory {
            site: Some(Arc::new(inputs.site)),
            air_band: settled.feeders.first().and_then(|feeder| feeder.air_band),
            feeders: sheet
                .feeders
                .iter()
                .zip(settled.feeders)
                .map(|(item, feeder)| (item.id.0, (Arc::clone(item), feeder)))
                .collect(),
        },
    }
}

/// Sources without heat, and other loads, which count at their current while a heater would ask for more.
fn source_notes(sources: &[WorkedSource]) -> Vec<MarginNote> {
    let mut notes: Vec<MarginNote> = sources
        .iter()
        .filter(|source| source.heat.is_none())
        .map(|source| {
            MarginNote::new(Grade::Query, Field::SourceHeat, NoteKind::SourceHeatUnknown)
                .held_by(Holder::Source(source.id))
        })
        .collect();
    let is_load = |source: &&WorkedSource| {
        source
            .current
            .as_ref()
            .is_some_and(|current| current.value > Current::amperes(0.0))
    };
    let loads: Vec<&WorkedSource> = sources.iter().filter(is_load).collect();
    if let Some(first) = loads.first() {
        let names = loads.iter().map(|source| source.name.clone()).collect();
        let kind = NoteKind::OtherLoadsAtCurrent { names };
        notes.push(
            MarginNote::new(Grade::Note, Field::SourceCurrent, kind)
                .held_by(Holder::Source(first.id)),
        );
    }
    notes
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
    main_loss: Option<Given<Power>>,
    notes: Vec<MarginNote>,
}

impl Settled {
    /// Temperature of the air inside, where it is known.
    fn inside(&self) -> Option<Temperature> {
        let inside = self.enclosure.air.inside.as_ref()?;
        Some(inside.value)
    }
}

/// Solves the loop between the air inside and the sizes inside.
///
/// Sizes, and so the heat, are the same for the whole of a band of air temperature, and hotter air never gives more heat:
/// so the bands are tried from the coolest up, and the first one whose heat leads into it, or below it, is the solution.
/// Where it leads below, no temperature fits exactly: the larger sizes and the warmer end, the edge between the two
/// bands, are kept and said. Exact, with at most one turn for each band.
fn settle(
    sheet: &Sheet,
    inputs: &SheetInputs,
    sources: &[WorkedSource],
    memory: &Memory,
) -> Settled {
    let work = |band| work_for(sheet, inputs, sources, band, memory);
    // A limit held by fans does not depend on the heat: its band is the solution.
    let room = inputs.site.ambient.value;
    if inputs.enclosure.is_ventilated {
        let limit = inputs.enclosure.limit.value;
        return work(Some(band_of(if room > limit { room } else { limit })));
    }
    // Until the walls are known, the air inside is at least as warm as the room.
    if inputs.enclosure.measures.is_none() {
        return work(Some(band_of(room)));
    }
    if let Some(settled) = settled_as_before(memory, &work) {
        return settled;
    }
    let mut cooler_edge = None;
    for edge in band_edges() {
        let mut settled = work(Some(edge));
        if settled
            .inside()
            .is_some_and(|inside| reaches(edge.to_kelvin(), inside.to_kelvin()))
        {
            keep_warmer_end(&mut settled, cooler_edge);
            return settled;
        }
        cooler_edge = Some(edge);
    }
    // Hotter than the last band, where no insulation may be used: worked for that air itself. Without the heat of wires
    // the air may come out below the edge after all; then the edge is the warmer end.
    let hottest = work(cooler_edge);
    let mut beyond = work(hottest.inside());
    keep_warmer_end(&mut beyond, cooler_edge);
    beyond
}

/// The band which held before, where it still leads into itself: since hotter air never gives more heat, no cooler band
/// can hold then, and none needs to be tried.
fn settled_as_before(
    memory: &Memory,
    work: &impl Fn(Option<Temperature>) -> Settled,
) -> Option<Settled> {
    let band = memory.air_band?;
    let cooler = band_edges().take_while(|edge| *edge < band).last();
    let is_a_band = band_edges().any(|edge| edge == band);
    let settled = is_a_band.then(|| work(Some(band)))?;
    let inside = settled.inside()?;
    let is_within = reaches(band.to_kelvin(), inside.to_kelvin())
        && cooler.is_none_or(|cooler| !reaches(cooler.to_kelvin(), inside.to_kelvin()));
    is_within.then_some(settled)
}

/// Lifts the air to the edge of the next cooler band, where its own heat leads below it.
fn keep_warmer_end(settled: &mut Settled, cooler_edge: Option<Temperature>) {
    let Some(edge) =
        cooler_edge.filter(|edge| settled.inside().is_some_and(|inside| inside < *edge))
    else {
        return;
    };
    let figure = lifted(&mut settled.enclosure.air, edge);
    // Everything connected is never cooler than what runs together.
    let connected = &mut settled.enclosure.air_connected;
    if connected
        .inside
        .as_ref()
        .is_some_and(|inside| inside.value < edge)
    {
        lifted(connected, edge);
    }
    settled.notes.push(
        MarginNote::new(
            Grade::Note,
            Field::InsideLimit,
            NoteKind::LoopKeptWarmerEnd { air: edge },
        )
        .about(&figure),
    );
}

/// Puts the air inside at `edge`, with what its heat alone would give in the working.
fn lifted(air: &mut Air, edge: Temperature) -> Arc<Figure> {
    let exact = air.inside.as_ref().map(|inside| inside.term("by heat"));
    let mut terms: Vec<Term> = exact.into_iter().collect();
    terms.push(Term::constant("edge", edge));
    let figure = Arc::new(rules::AIR_LOOP_END.figure(edge, terms));
    air.inside = Given::from_figure(&figure);
    figure
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
        main_loss: main,
        notes,
    }
}
