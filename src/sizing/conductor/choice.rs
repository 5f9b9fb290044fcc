//! The choice of a size: each size is tried from the smallest up.

use super::ampacity::{SizeFailure, ampacities, terminal_column, usable};
use super::{ConductorChoice, DecidedBy, Demand, Rejected, RunInput, Surrounding};
use crate::math::reaches;
use crate::quantity::{Current, WireSize};
use crate::sizing::rules;
use crate::tables::Metal;
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, RunField, Term};
use std::sync::Arc;

/// Smallest copper and aluminium building wire. Source: NEC 2023, 310.3(A); UL 508A asks the same inside.
pub(super) const fn smallest_wire(metal: Metal) -> WireSize {
    match metal {
        Metal::Copper => WireSize::Awg14,
        Metal::Aluminium => WireSize::Awg12,
    }
}

/// Conductors in parallel start here. Source: NEC 2023, 310.10(G).
pub(super) const SMALLEST_PARALLEL: WireSize = WireSize::Awg1Over0;

/// Why a size does not fit, or that it does.
enum Trial {
    Fits,
    Fails(DecidedBy, Option<Arc<Figure>>),
    Impossible(SizeFailure),
}

fn try_size(
    input: &RunInput,
    size: WireSize,
    by_terminals: Current,
    by_insulation: Current,
) -> Trial {
    if size < smallest_wire(input.metal.value) {
        return Trial::Fails(DecidedBy::SmallestWire, None);
    }
    if input.sets.value > 1 && size < SMALLEST_PARALLEL {
        return Trial::Fails(DecidedBy::ParallelMinimum, None);
    }
    let both = match ampacities(input, by_terminals, size) {
        Ok(both) => both,
        Err(failure) => return Trial::Impossible(failure),
    };
    let short = |figure: &Arc<Figure>, needed: Current| {
        figure
            .quantity::<Current>()
            .filter(|carries| !reaches(carries.to_amperes(), needed.to_amperes()))
    };
    let terminal_short = short(&both.terminal, by_terminals);
    let corrected_short = both
        .corrected
        .as_ref()
        .and_then(|figure| short(figure, by_insulation));
    match (terminal_short, corrected_short, both.corrected) {
        (None, None, _) => Trial::Fits,
        // Where both fall short, the lower one tells more.
        (terminal, Some(corrected), Some(figure))
            if terminal.is_none_or(|terminal| corrected < terminal) =>
        {
            Trial::Fails(DecidedBy::CorrectedColumn, Some(figure))
        }
        _ => Trial::Fails(DecidedBy::TerminalColumn, Some(both.terminal)),
    }
}

pub(super) fn choose(
    input: &RunInput,
    by_terminals: Current,
    by_insulation: Current,
) -> ConductorChoice {
    if matches!(input.surrounding, Surrounding::Inside { .. })
        && input.metal.value == Metal::Aluminium
    {
        return ConductorChoice::NoTable;
    }
    let mut smaller = None;
    let mut largest = None;
    for size in WireSize::ALL {
        match try_size(input, size, by_terminals, by_insulation) {
            Trial::Fits => {
                let decided_by = smaller
                    .as_ref()
                    .map_or(DecidedBy::SmallestWire, |rejected: &Rejected| {
                        rejected.fails
                    });
                return ConductorChoice::Chosen {
                    size,
                    decided_by,
                    smaller,
                };
            }
            Trial::Fails(fails, ampacity) => {
                if ampacity.is_some() {
                    largest = Some(size);
                }
                smaller = Some(Rejected {
                    size,
                    fails,
                    ampacity,
                });
            }
            Trial::Impossible(SizeFailure::TooHot) => return ConductorChoice::TooHot,
            Trial::Impossible(SizeFailure::NoCell) => {}
        }
    }
    let column = terminal_column(input.terminal.value, by_terminals);
    largest
        .and_then(|largest| {
            Some(ConductorChoice::NoneFits {
                largest,
                carries: usable(input, by_terminals, largest)?.quantity()?,
                needed: by_terminals,
            })
        })
        .unwrap_or(ConductorChoice::NoCell { column })
}

pub(super) fn installed_size(
    input: &RunInput,
    demand: &Demand,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) -> Option<(WireSize, Arc<Figure>)> {
    let needed: Current = demand.ampacity.quantity()?;
    let chosen = match choice {
        ConductorChoice::Chosen { size, smaller, .. } => {
            let mut terms = vec![Term::of("I_z", &demand.ampacity), input.sets.term("n")];
            terms.extend(usable(input, needed, *size).map(|figure| Term::of("I_u", &figure)));
            if let Some(rejected) = smaller {
                terms.push(Term::constant("next smaller", rejected.size));
                terms.extend(
                    rejected
                        .ampacity
                        .as_ref()
                        .map(|figure| Term::of("its I_u", figure)),
                );
            }
            Some((*size, Arc::new(rules::CONDUCTOR_SIZE.figure(*size, terms))))
        }
        _ => None,
    };
    let Some(entered) = input.size else {
        return chosen;
    };
    let field = Field::Run(input.run, RunField::Size);
    let mut terms = vec![
        Given::entered(field, entered).term("size"),
        Term::of("I_z", &demand.ampacity),
        input.sets.term("n"),
    ];
    match usable(input, needed, entered) {
        Some(figure) => terms.push(Term::of("I_u", &figure)),
        None if !matches!(
            choice,
            ConductorChoice::NoTable | ConductorChoice::NoCell { .. } | ConductorChoice::TooHot
        ) =>
        {
            notes.push(MarginNote::new(
                Grade::Stop,
                field,
                NoteKind::SizeNotInTable {
                    run: input.run,
                    entered,
                },
            ));
        }
        None => {}
    }
    terms.extend(chosen.map(|(_, figure)| Term::of("smallest", &figure)));
    Some((
        entered,
        Arc::new(rules::CONDUCTOR_ENTERED.figure(entered, terms)),
    ))
}
