//! Fault current at the panel by the point-to-point method.

use crate::physics::circuit::{
    FaultRun, run_factor, run_multiplier, share_of, transformer_current, transformer_fault_current,
};
use crate::quantity::{ApparentPower, Current, Length, Ratio, Voltage, WireSize};
use crate::sizing::rules;
use crate::tables::fault_constants::fault_constant_row;
use crate::tables::{Conduit, Known, Metal};
use crate::working::{
    Field, Figure, Given, Grade, MarginNote, MemoryTable, NoteKind, Run, RunField, Term,
};
use std::sync::Arc;

/// The largest fault current, worked.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Fault {
    /// Full-load current of the transformer.
    pub transformer_current: Option<Arc<Figure>>,
    /// Fault current at the start of the incoming run: at the transformer, or as entered.
    pub at_source: Option<Given<Current>>,
    /// The factor f of the run.
    pub run_factor: Option<Arc<Figure>>,
    /// The multiplier M of the run.
    pub multiplier: Option<Arc<Figure>>,
    /// Fault current at the panel.
    pub at_panel: Option<Given<Current>>,
}

/// What the fault current is worked from.
#[derive(Debug, Clone, PartialEq)]
pub struct FaultInput {
    /// Voltage between lines.
    pub voltage: Given<Voltage>,
    /// Fault current at the start of the run, where entered: it goes before the transformer.
    pub at_source: Option<Given<Current>>,
    /// Rated power of the transformer, where entered.
    pub transformer: Option<Given<ApparentPower>>,
    /// Its impedance.
    pub impedance: Given<Ratio>,
    /// Whether that was measured on the unit, so that no tolerance is taken off.
    pub is_measured: bool,
    /// The incoming run, or the field which is missing of it.
    pub run: Result<FaultRunInput, Field>,
}

/// The incoming run as the method sees it.
#[derive(Debug, Clone, PartialEq)]
pub struct FaultRunInput {
    /// Size.
    pub size: WireSize,
    /// Metal.
    pub metal: Metal,
    /// Raceway.
    pub conduit: Conduit,
    /// Conductors in parallel.
    pub sets: Given<u32>,
    /// Length one way.
    pub length: Given<Length>,
}

/// The share of a nameplate impedance which is counted for the largest fault current.
///
/// Listed transformers of 25 kVA and up may lie 10 per cent below their nameplate. Source: point-to-point method.
const NAMEPLATE_COUNTED: Ratio = Ratio::of_one(0.9);

/// The largest fault current at the panel by the point-to-point method, three-phase, from an infinite bus.
///
/// Motors on drives add nothing; other motors on the bus are not counted here.
pub fn fault_at_panel(input: &FaultInput, notes: &mut Vec<MarginNote>) -> Fault {
    let transformer_figure = input.transformer.as_ref().map(|power| {
        Arc::new(rules::TRANSFORMER_CURRENT.figure(
            transformer_current(power.value, input.voltage.value),
            [power.term("S_t"), input.voltage.term("U")],
        ))
    });
    let at_source = input
        .at_source
        .clone()
        .or_else(|| at_transformer(transformer_figure.as_ref()?, input));
    let Some(start) = at_source.clone() else {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::TransformerPower,
            NoteKind::FaultCurrentUnknown,
        ));
        return Fault {
            transformer_current: transformer_figure,
            ..Fault::default()
        };
    };
    let fault = Fault {
        transformer_current: transformer_figure,
        at_source,
        ..Fault::default()
    };
    let run = input.run.as_ref();
    let Some((run, constant)) = run
        .ok()
        .and_then(|run| Some((run, constant_of(run, notes)?)))
    else {
        if let Err(missing) = run {
            notes.push(MarginNote::new(
                Grade::Query,
                *missing,
                NoteKind::FaultRunUnknown,
            ));
        }
        // Without the run the current at its start stands for the panel: it can only be larger.
        return Fault {
            at_panel: Some(start),
            ..fault
        };
    };
    let factor = run_factor(
        start.value,
        input.voltage.value,
        FaultRun {
            constant: constant.value,
            length: run.length.value,
            sets: run.sets.value,
        },
    );
    let factor_figure = Arc::new(rules::RUN_FACTOR.figure(
        factor,
        [
            run.length.term("L"),
            start.term("I_sc"),
            constant.term("C"),
            run.sets.term("n"),
            input.voltage.term("U"),
        ],
    ));
    let multiplier = run_multiplier(factor);
    let multiplier_figure =
        Arc::new(rules::RUN_MULTIPLIER.figure(multiplier, [Term::of("f", &factor_figure)]));
    let at_panel = Arc::new(rules::FAULT_AT_PANEL.figure(
        share_of(multiplier, start.value),
        [Term::of("M", &multiplier_figure), start.term("I_sc")],
    ));
    Fault {
        run_factor: Some(factor_figure),
        multiplier: Some(multiplier_figure),
        at_panel: Given::from_figure(&at_panel),
        ..fault
    }
}

fn at_transformer(full_load: &Arc<Figure>, input: &FaultInput) -> Option<Given<Current>> {
    let counted = if input.is_measured {
        Ratio::of_one(1.0)
    } else {
        NAMEPLATE_COUNTED
    };
    let figure = rules::TRANSFORMER_FAULT.figure(
        transformer_fault_current(full_load.quantity()?, input.impedance.value, counted),
        [
            Term::of("I_fl", full_load),
            input.impedance.term("z_t"),
            Term::constant("t", counted),
        ],
    );
    Given::from_figure(&Arc::new(figure))
}

fn constant_of(
    run: &FaultRunInput,
    notes: &mut Vec<MarginNote>,
) -> Option<Given<crate::quantity::LengthPerImpedance>> {
    let cell = fault_constant_row(run.size).and_then(|row| row.constant(run.metal, run.conduit));
    let field = Field::Run(Run::Incoming, RunField::Size);
    let Some((constant, known)) = cell else {
        notes.push(MarginNote::new(
            Grade::Query,
            field,
            NoteKind::FaultConstantMissing { size: run.size },
        ));
        return None;
    };
    if known == Known::FromMemory {
        notes.push(MarginNote::new(
            Grade::Query,
            field,
            NoteKind::TableFromMemory {
                table: MemoryTable::FaultConstants,
                rows: vec![run.size.number().to_owned()],
            },
        ));
    }
    let figure = rules::FAULT_CONSTANT.figure(constant, [Term::constant("size", run.size)]);
    Given::from_figure(&Arc::new(figure))
}
