//! Ampacities of one size: by its terminals, and by its insulation corrected for ambient and count.

use super::{RunInput, Surrounding, Terminal};
use crate::math::reaches;
use crate::quantity::{Current, Ratio, Temperature, WireSize};
use crate::sizing::rules;
use crate::tables::nec_conductors::{ambient_factor, ampacity_row, count_factor};
use crate::tables::ul_508a::inside_row;
use crate::tables::{Column, Metal};
use crate::working::{Figure, Term};
use std::sync::Arc;

/// Above this required ampacity unmarked terminals are read at 75 °C. Source: NEC 2023, 110.14(C)(1); UL 508A, 29.6.
const UNMARKED_60_UP_TO: Current = Current::amperes(100.0);

/// The column in which the terminals are read.
pub fn terminal_column(terminal: Terminal, needed: Current) -> Column {
    match terminal {
        Terminal::Marked60 => Column::C60,
        Terminal::Marked75 => Column::C75,
        Terminal::Unmarked => {
            if reaches(UNMARKED_60_UP_TO.to_amperes(), needed.to_amperes()) {
                Column::C60
            } else {
                Column::C75
            }
        }
    }
}

/// Both ampacities of one size, all conductors of a phase together. The corrected one is `None` where the air asks for
/// no correction inside.
pub(super) struct Ampacities {
    pub(super) terminal: Arc<Figure>,
    pub(super) corrected: Option<Arc<Figure>>,
}

pub(super) enum SizeFailure {
    /// The table has no such cell.
    NoCell,
    /// The insulation may not be used in air so hot.
    TooHot,
}

pub(super) fn ampacities(
    input: &RunInput,
    needed: Current,
    size: WireSize,
) -> Result<Ampacities, SizeFailure> {
    let by_terminals = terminal_column(input.terminal.value, needed);
    let (column, cell, rule) = match input.surrounding {
        // Inside, wire of a cooler insulation than the terminals is read by its insulation.
        Surrounding::Inside { .. } => {
            let column = by_terminals.min(input.insulation.value);
            // Table 28.1 is of copper alone.
            let row = inside_row(size).filter(|_| input.metal.value == Metal::Copper);
            let cell = row.and_then(|row| row.ampacity(column));
            (column, cell, &rules::INSIDE_CELL)
        }
        Surrounding::Field { .. } => {
            let row = ampacity_row(size);
            let cell = row.and_then(|row| row.ampacity(input.metal.value, by_terminals));
            (by_terminals, cell, &rules::FIELD_TERMINAL_CELL)
        }
    };
    let cell = cell.ok_or(SizeFailure::NoCell)?;
    let cell_figure = Arc::new(rule.figure(
        cell,
        [
            Term::constant("size", size),
            Term::constant("column", Temperature::celsius(f64::from(column.celsius()))),
        ],
    ));
    let terminal = Arc::new(rules::TERMINAL_AMPACITY.figure(
        f64::from(input.sets.value) * cell,
        [input.sets.term("n"), Term::of("I_t", &cell_figure)],
    ));
    Ok(Ampacities {
        terminal,
        corrected: corrected(input, size)?,
    })
}

fn corrected(input: &RunInput, size: WireSize) -> Result<Option<Arc<Figure>>, SizeFailure> {
    let insulation = input.insulation.value;
    let (ambient, count) = match &input.surrounding {
        // Table 28.1 stands for 30 °C and less; above, the insulation is tested besides.
        Surrounding::Inside { air } => match air {
            Some(air) if *air > BASE_AMBIENT => (
                Term::constant("T_a", *air),
                Term::constant("k_c", Ratio::of_one(1.0)),
            ),
            _ => return Ok(None),
        },
        Surrounding::Field { ambient, carrying } => {
            let factor = count_factor(carrying.value);
            let figure = rules::COUNT_FACTOR.figure(factor, [carrying.term("N")]);
            (ambient.term("T_a"), Term::of("k_c", &Arc::new(figure)))
        }
    };
    let (Some(temperature), Some(count_ratio)) =
        (ambient.amount.quantity(), count.amount.quantity::<Ratio>())
    else {
        return Ok(None);
    };
    let factor = ambient_factor(temperature, insulation).ok_or(SizeFailure::TooHot)?;
    let cell = ampacity_row(size)
        .and_then(|row| row.ampacity(input.metal.value, insulation))
        .ok_or(SizeFailure::NoCell)?;
    let cell_figure = Arc::new(rules::FIELD_INSULATION_CELL.figure(
        cell,
        [
            Term::constant("size", size),
            Term::constant(
                "column",
                Temperature::celsius(f64::from(insulation.celsius())),
            ),
        ],
    ));
    let factor_figure = Arc::new(rules::AMBIENT_FACTOR.figure(
        factor,
        [
            ambient,
            Term::constant(
                "column",
                Temperature::celsius(f64::from(insulation.celsius())),
            ),
        ],
    ));
    let sum = f64::from(input.sets.value) * (factor * (count_ratio * cell));
    Ok(Some(Arc::new(rules::CORRECTED_AMPACITY.figure(
        sum,
        [
            input.sets.term("n"),
            Term::of("I_i", &cell_figure),
            Term::of("k_a", &factor_figure),
            count,
        ],
    ))))
}

/// The ambient for which Tables 310.16 and 28.1 are printed.
pub(super) const BASE_AMBIENT: Temperature = Temperature::celsius(30.0);

/// The usable ampacity of a size: the smaller of its two ampacities.
pub(super) fn usable(input: &RunInput, needed: Current, size: WireSize) -> Option<Arc<Figure>> {
    let both = ampacities(input, needed, size).ok()?;
    let Some(corrected) = both.corrected else {
        return Some(both.terminal);
    };
    let (terminal_amperes, corrected_amperes): (Current, Current) =
        (both.terminal.quantity()?, corrected.quantity()?);
    let smaller = if corrected_amperes < terminal_amperes {
        corrected_amperes
    } else {
        terminal_amperes
    };
    Some(Arc::new(rules::USABLE_AMPACITY.figure(
        smaller,
        [Term::of("I_T", &both.terminal), Term::of("I_C", &corrected)],
    )))
}
