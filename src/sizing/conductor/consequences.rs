//! What follows from the installed size: voltage drop, and heat where the run lies inside.

use super::{Demand, RunInput, Surrounding};
use crate::physics::circuit::{DropRun, reactive_factor, voltage_drop};
use crate::physics::heat::run_loss;
use crate::quantity::{Power, WireSize};
use crate::sizing::rules;
use crate::tables::nec_chapter_9::{conductor_row, impedance_row};
use crate::working::{Field, Figure, Grade, MarginNote, NoteKind, RunField, Term};
use std::sync::Arc;

pub(super) fn drop_of(
    input: &RunInput,
    demand: &Demand,
    size: WireSize,
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    let length = input.length.as_ref()?;
    let cell =
        impedance_row(size).and_then(|row| row.impedance(input.metal.value, input.conduit.value));
    let Some(impedance) = cell else {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Size),
            NoteKind::DropUnknown {
                run: input.run,
                size,
            },
        ));
        return None;
    };
    let row = || Term::constant("size", size);
    let resistance = Arc::new(rules::TABLE_9_RESISTANCE.figure(impedance.resistance, [row()]));
    let reactance = Arc::new(rules::TABLE_9_REACTANCE.figure(impedance.reactance, [row()]));
    let cosphi = &input.power_factor;
    let sinphi = Arc::new(
        rules::REACTIVE_FACTOR.figure(reactive_factor(cosphi.value), [cosphi.term("cosphi")]),
    );
    let drop = voltage_drop(
        demand.carried.value,
        cosphi.value,
        DropRun {
            resistance: impedance.resistance,
            reactance: impedance.reactance,
            length: length.value,
            sets: input.sets.value,
        },
    );
    Some(Arc::new(rules::VOLTAGE_DROP.figure(
        drop,
        [
            demand.carried.term("I"),
            Term::of("R", &resistance),
            cosphi.term("cosphi"),
            Term::of("X", &reactance),
            Term::of("sinphi", &sinphi),
            length.term("L"),
            input.sets.term("n"),
        ],
    )))
}

/// Heat of a run inside; runs in the field warm something else.
pub(super) fn heat_of(input: &RunInput, demand: &Demand, size: WireSize) -> Option<Arc<Figure>> {
    if !matches!(input.surrounding, Surrounding::Inside { .. }) {
        return None;
    }
    let length = input.length.as_ref()?;
    let resistance = conductor_row(size)?.resistance(input.metal.value);
    let cell =
        Arc::new(rules::TABLE_8_RESISTANCE.figure(resistance, [Term::constant("size", size)]));
    let heat: Power = run_loss(
        demand.carried.value,
        resistance,
        length.value,
        input.sets.value,
    );
    Some(Arc::new(rules::RUN_HEAT.figure(
        heat,
        [
            demand.carried.term("I"),
            Term::of("R", &cell),
            length.term("L"),
            input.sets.term("n"),
        ],
    )))
}
