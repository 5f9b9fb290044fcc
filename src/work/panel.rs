//! The panel: incoming circuit, fault current, and the lowest short-circuit rating inside.

use super::feeder::{Feeder, shown_tag};
use super::{WorkedFeeder, WorkedSource};
use crate::assume::SheetInputs;
use crate::quantity::{Current, Power};
use crate::sizing::fault::{Fault, FaultInput, FaultRunInput, fault_at_panel};
use crate::sizing::heat::assumed_device_loss;
use crate::sizing::panel::{
    FeederLoad, IncomingCircuit, IncomingInput, OtherLoad, incoming_circuit,
};
use crate::working::{Field, Given, Grade, Holder, MarginNote, NoteKind, Run, RunField};

/// The short-circuit ratings inside as entered.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Ratings {
    /// The lowest, and everything which has it.
    pub(super) lowest: Option<(Current, Vec<Holder>)>,
    /// Whether every part which needs a rating has one: without it nothing is found within.
    pub(super) is_complete: bool,
}

/// Works the incoming circuit. Its grounding conductor follows the device ahead of it, which the sheet does not know.
pub(super) fn incoming_of(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    sources: &[WorkedSource],
    notes: &mut Vec<MarginNote>,
) -> IncomingCircuit {
    let Some(voltage) = inputs.site.voltage() else {
        return IncomingCircuit::default();
    };
    let loads: Vec<FeederLoad> = feeders
        .iter()
        .filter_map(|feeder| feeder.load.clone())
        .collect();
    let others = sources
        .iter()
        .filter_map(|source| {
            Some(OtherLoad {
                name: source.name.as_str().into(),
                is_running: source.is_running,
                current: source.current.clone()?,
            })
        })
        .collect();
    incoming_circuit(
        &IncomingInput {
            feeders: loads,
            others,
            run: inputs.incoming.clone(),
            voltage: voltage.clone(),
            main: inputs.main.clone(),
            main_rating: inputs.main_rating.clone(),
            edition: inputs.site.basis.edition(),
        },
        notes,
    )
}

/// Loss of the main device: as entered, else assumed from its limit at the running current.
pub(super) fn main_loss(
    inputs: &SheetInputs,
    incoming: &IncomingCircuit,
    notes: &mut Vec<MarginNote>,
) -> Option<Given<Power>> {
    if inputs.main_loss.is_some() {
        return inputs.main_loss.clone();
    }
    let main = incoming.main.as_ref()?;
    let (rating, current) = (
        main.rating.as_ref()?,
        Given::from_figure(incoming.running.as_ref()?)?,
    );
    let loss = assumed_device_loss(main.device.value, rating, &current);
    if loss.is_none() {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::MainLoss,
            NoteKind::DeviceLossUnknown {
                rating: rating.value,
            },
        ));
    }
    loss
}

/// Works the fault current at the panel.
pub(super) fn fault_of(
    inputs: &SheetInputs,
    incoming: &IncomingCircuit,
    notes: &mut Vec<MarginNote>,
) -> Fault {
    let Some(voltage) = inputs.site.voltage() else {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::SupplyVoltage,
            NoteKind::FaultCurrentUnknown,
        ));
        return Fault::default();
    };
    let run = &inputs.incoming;
    // The installed size, else the smallest which fits: without loads only an entered size is known.
    let size = incoming
        .conductors
        .as_ref()
        .and_then(|conductors| conductors.installed())
        .or(run.size);
    let part = |part| Field::Run(Run::Incoming, part);
    let run = match (size, run.length.clone()) {
        (Some(size), Some(length)) => Ok(FaultRunInput {
            size,
            metal: run.metal.value,
            conduit: run.conduit.value,
            sets: run.sets.clone(),
            length,
        }),
        (_, None) => Err(part(RunField::Length)),
        (None, _) => Err(part(RunField::Size)),
    };
    if inputs.source_fault.is_none()
        && inputs.transformer.is_some()
        && !inputs.impedance.is_entered()
    {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::TransformerImpedance,
            NoteKind::ImpedanceAssumed {
                assumed: inputs.impedance.value,
            },
        ));
    }
    fault_at_panel(
        &FaultInput {
            voltage: voltage.clone(),
            at_source: inputs.source_fault.clone(),
            transformer: inputs.transformer.clone(),
            impedance: inputs.impedance.clone(),
            is_measured: inputs.is_impedance_measured,
            run,
        },
        notes,
    )
}

/// Holds the fault current against the lowest short-circuit rating which was entered.
pub(super) fn ratings_of(
    inputs: &SheetInputs,
    feeders: &[Feeder],
    fault: &Fault,
    notes: &mut Vec<MarginNote>,
) -> Ratings {
    let loaded = || {
        feeders
            .iter()
            .filter(|feeder| feeder.worked.device.is_some())
    };
    let missing: Vec<String> = loaded()
        .filter(|feeder| feeder.worked.short_circuit_rating.is_none())
        .map(|feeder| tag_of(&feeder.worked))
        .collect();
    let main_too = inputs.main_short_circuit_rating.is_none();
    let is_complete = !main_too && missing.is_empty();
    if loaded().next().is_some() && !is_complete {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::MainShortCircuitRating,
            NoteKind::RatingMissing {
                tags: missing,
                main_too,
            },
        ));
    }
    let lowest = lowest_of(inputs, feeders);
    if let (Some((rating, holders)), Some(fault)) = (&lowest, &fault.at_panel)
        && *rating < fault.value
    {
        let lowest = holders.iter().filter_map(|holder| match holder {
            Holder::Feeder(id) => feeders.iter().find(|feeder| feeder.worked.id == *id),
            _ => None,
        });
        let kind = NoteKind::FaultAboveRating {
            fault: fault.value,
            rating: *rating,
            lowest: lowest.map(|feeder| tag_of(&feeder.worked)).collect(),
        };
        let holder = holders.first().copied().unwrap_or(Holder::Sheet);
        let field = match holder {
            Holder::Feeder(_) => Field::ShortCircuitRating,
            _ => Field::MainShortCircuitRating,
        };
        notes.push(MarginNote::new(Grade::Stop, field, kind).held_by(holder));
    }
    Ratings {
        lowest,
        is_complete,
    }
}

fn lowest_of(inputs: &SheetInputs, feeders: &[Feeder]) -> Option<(Current, Vec<Holder>)> {
    let entered: Vec<(Current, Holder)> = feeders
        .iter()
        .filter_map(|feeder| {
            let rating = feeder.worked.short_circuit_rating.as_ref()?;
            Some((rating.value, Holder::Feeder(feeder.worked.id)))
        })
        .chain(
            inputs
                .main_short_circuit_rating
                .as_ref()
                .map(|rating| (rating.value, Holder::Sheet)),
        )
        .collect();
    let lowest = entered
        .iter()
        .map(|(rating, _)| *rating)
        .reduce(|a, b| if b < a { b } else { a })?;
    let holders = entered
        .into_iter()
        .filter(|(rating, _)| *rating <= lowest)
        .map(|(_, holder)| holder)
        .collect();
    Some((lowest, holders))
}

/// A feeder's tag as findings name it.
pub(super) fn tag_of(feeder: &WorkedFeeder) -> String {
    shown_tag(&feeder.tag, feeder.id).to_string()
}
