//! The totals at the head of the margin, each beside its limit and its verdict.

use super::panel::Ratings;
use super::{Ledger, Total, TotalKind, Verdict, WorkedEnclosure};
use crate::assume::SheetInputs;
use crate::math::reaches;
use crate::quantity::{AirFlow, Current};
use crate::sizing::air::Air;
use crate::sizing::fault::Fault;
use crate::sizing::panel::IncomingCircuit;
use crate::working::{Amount, Figure, MarginNote, NoteKind, Origin};
use std::sync::Arc;

/// Everything the totals are read from.
pub(super) struct Findings<'a> {
    pub(super) inputs: &'a SheetInputs,
    pub(super) ledger: &'a Ledger,
    pub(super) enclosure: &'a WorkedEnclosure,
    pub(super) incoming: &'a IncomingCircuit,
    pub(super) fault: &'a Fault,
    pub(super) ratings: &'a Ratings,
    pub(super) gaps: Gaps,
}

/// What is missing in the sums: a total over a gap is never found within its limit.
#[derive(Debug, Clone, Copy)]
pub(super) struct Gaps {
    heat: bool,
    currents: bool,
}

impl Gaps {
    /// The gaps which were noted.
    pub(super) fn of(notes: &[MarginNote]) -> Self {
        let is_noted = |wanted: fn(&NoteKind) -> bool| notes.iter().any(|note| wanted(&note.kind));
        Self {
            heat: is_noted(|kind| {
                matches!(
                    kind,
                    NoteKind::LedgerIncomplete { .. }
                        | NoteKind::SunMissing
                        | NoteKind::DeviceLossUnknown { .. }
                        | NoteKind::SourceHeatUnknown
                )
            }),
            currents: is_noted(|kind| matches!(kind, NoteKind::MainIncomplete { .. })),
        }
    }
}

/// A verdict on a sum: over a gap it cannot be said that it is within.
fn over(has_gap: bool, verdict: Verdict) -> Verdict {
    match verdict {
        Verdict::Within if has_gap => Verdict::Unknown,
        verdict => verdict,
    }
}

/// All totals, in the order in which they are read.
pub(super) fn totals_of(found: &Findings<'_>) -> Vec<Total> {
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

/// The working of a value which has one.
fn figure_of(origin: &Origin) -> Option<Arc<Figure>> {
    match origin {
        Origin::Figure(figure) => Some(Arc::clone(figure)),
        Origin::Entered(_) | Origin::Assumed(_) | Origin::Constant => None,
    }
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
            .inside
            .as_ref()
            .and_then(|inside| figure_of(&inside.origin)),
        limit: Some(limit.into()),
        verdict: over(found.gaps.heat, verdict),
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
        (Some(needed), Some(installed)) => match needed.quantity::<AirFlow>() {
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
        verdict: over(found.gaps.heat, verdict),
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
        // A stop says that no size fits.
        (None, Some(_)) => Verdict::Beyond,
        _ => Verdict::Unknown,
    };
    Total {
        kind: TotalKind::IncomingCurrent,
        running: amount_of(found.incoming.running.as_ref()),
        connected: amount_of(found.incoming.connected.as_ref()),
        figure: found.incoming.running.clone(),
        limit: amount_of(carries.as_ref()),
        verdict: over(found.gaps.currents, verdict),
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
        verdict: over(found.gaps.currents, verdict),
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
        figure: fault.and_then(|fault| figure_of(&fault.origin)),
        limit: lowest.map(Amount::from),
        verdict,
    }
}
