//! What is said about a size: none fits, hot air decided, an entered one is too small, another reading differs.

use super::ampacity::BASE_AMBIENT;
use super::choice::{SMALLEST_PARALLEL, choose, smallest_wire};
use super::{ConductorChoice, RunInput, Surrounding};
use crate::math::reaches;
use crate::quantity::{Current, Temperature, WireSize};
use crate::working::{Field, Figure, Grade, MarginNote, NoteKind, RunField};
use std::sync::Arc;

pub(super) fn note_choice(
    input: &RunInput,
    needed: Current,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) {
    let run = input.run;
    let (part, kind) = match choice {
        ConductorChoice::Chosen { .. } => {
            note_inside_air(input, needed, choice, notes);
            return;
        }
        ConductorChoice::NoneFits {
            largest,
            carries,
            needed,
        } => (
            RunField::Sets,
            NoteKind::NoConductorFits {
                run,
                needed: *needed,
                carries: *carries,
                largest: *largest,
            },
        ),
        ConductorChoice::TooHot => {
            let ambient = match &input.surrounding {
                Surrounding::Field { ambient, .. } => ambient.value,
                Surrounding::Inside { air } => air.unwrap_or(BASE_AMBIENT),
            };
            (
                RunField::Insulation,
                NoteKind::AmbientBeyondInsulation { run, ambient },
            )
        }
        ConductorChoice::NoTable => (RunField::Metal, NoteKind::AluminiumInside { run }),
        ConductorChoice::NoCell { column } => (
            RunField::Terminal,
            NoteKind::NoCellInColumn {
                run,
                column: Temperature::celsius(f64::from(column.celsius())),
            },
        ),
    };
    notes.push(MarginNote::new(Grade::Stop, Field::Run(run, part), kind));
}

/// Says where the hot air inside, not Table 28.1 as printed, decided the size.
fn note_inside_air(
    input: &RunInput,
    needed: Current,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) {
    let Surrounding::Inside { air: Some(air) } = input.surrounding else {
        return;
    };
    let cool = RunInput {
        surrounding: Surrounding::Inside { air: None },
        ..input.clone()
    };
    let in_cool_air = choose(&cool, needed, needed);
    if let (ConductorChoice::Chosen { size: hot, .. }, ConductorChoice::Chosen { size: cool, .. }) =
        (choice, &in_cool_air)
        && hot != cool
    {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Insulation),
            NoteKind::InsideAirDecides {
                run: input.run,
                air,
            },
        ));
    }
}

pub(super) fn note_entered(
    input: &RunInput,
    entered: WireSize,
    needed: Current,
    (ampacity, choice): (&Arc<Figure>, &ConductorChoice),
    notes: &mut Vec<MarginNote>,
) {
    let run = input.run;
    let field = Field::Run(run, RunField::Size);
    if input.sets.value > 1 && entered < SMALLEST_PARALLEL {
        notes.push(MarginNote::new(
            Grade::Stop,
            field,
            NoteKind::ParallelTooSmall { run, entered },
        ));
    }
    let carries: Option<Current> = ampacity.quantity();
    let is_short =
        carries.is_some_and(|carries| !reaches(carries.to_amperes(), needed.to_amperes()));
    let is_thin = entered < smallest_wire(input.metal.value);
    if let ConductorChoice::Chosen { size: smallest, .. } = choice
        && (is_short || is_thin)
    {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                field,
                NoteKind::ConductorTooSmall {
                    run,
                    entered,
                    smallest: *smallest,
                },
            )
            .about(ampacity),
        );
    }
}

/// Some test the corrected column at 100 per cent of the current only: where that gives another size, it is said.
pub(super) fn note_other_reading(
    input: &RunInput,
    plain: Current,
    needed: Current,
    taken: WireSize,
    notes: &mut Vec<MarginNote>,
) {
    if !matches!(input.surrounding, Surrounding::Field { .. }) {
        return;
    }
    if let ConductorChoice::Chosen { size, .. } = choose(input, needed, plain)
        && size != taken
    {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Size),
            NoteKind::SizeAtHundredPerCent {
                run: input.run,
                size,
                taken,
            },
        ));
    }
}
