//! Conductors of a run: the smallest size which satisfies every rule, and why the next smaller fails.
//!
//! Here: what a run is asked and what comes out. The ampacities of a size are in `ampacity`, the choice in `choice`, what
//! is said about it in `findings`, drop and heat of the installed size in `consequences`.

mod ampacity;
mod choice;
mod consequences;
mod findings;

pub use ampacity::terminal_column;

use crate::physics::circuit::share_of;
use crate::quantity::{Current, Length, Ratio, Temperature, Voltage, WireSize};
use crate::sizing::rules;
use crate::tables::nec_conductors::ampacity_row;
use crate::tables::{Column, Conduit, Metal};
use crate::working::{
    Amount, Field, Figure, Given, Known, MarginNote, Origin, Rule, Run, RunField, Term,
};
use ampacity::usable;
use choice::{choose, installed_size};
use consequences::{drop_of, heat_of};
use findings::{note_choice, note_entered, note_other_reading};
use std::sync::Arc;

/// Where a run lies, with what its rule needs.
#[derive(Debug, Clone, PartialEq)]
pub enum Surrounding {
    /// Inside the enclosure: UL 508A Table 28.1.
    Inside {
        /// Upper edge of the band in which the air inside lies, where it is known. Not the air itself, so that a
        /// size and its working hold for the whole band.
        air: Option<Temperature>,
    },
    /// In the field: NEC Table 310.16.
    Field {
        /// Temperature of the air along the route.
        ambient: Given<Temperature>,
        /// Current-carrying conductors in the raceway.
        carrying: Given<u32>,
    },
}

/// What the terminals of a run are marked with.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Terminal {
    /// No mark: 60 °C up to 100 A, 75 °C above.
    Unmarked,
    /// Marked 60 °C.
    Marked60,
    /// Marked 75 °C.
    Marked75,
}

/// A run to be sized.
#[derive(Debug, Clone, PartialEq)]
pub struct RunInput {
    /// Which run.
    pub run: Run,
    /// Where it lies.
    pub surrounding: Surrounding,
    /// Copper or aluminium.
    pub metal: Given<Metal>,
    /// Conductors in parallel for each phase.
    pub sets: Given<u32>,
    /// Size to be installed, where entered.
    pub size: Option<WireSize>,
    /// Insulation.
    pub insulation: Given<Column>,
    /// Mark at the terminals.
    pub terminal: Given<Terminal>,
    /// Raceway.
    pub conduit: Given<Conduit>,
    /// Length one way, where known.
    pub length: Option<Given<Length>>,
    /// Power factor for the drop.
    pub power_factor: Given<Ratio>,
}

/// Which rule decided a size.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum DecidedBy {
    /// Ampacity in the column of the terminals.
    TerminalColumn,
    /// Ampacity of the insulation's column, corrected for ambient and count.
    CorrectedColumn,
    /// The smallest wire which may be used at all.
    SmallestWire,
    /// Conductors in parallel start at 1/0 AWG.
    ParallelMinimum,
}

/// The size just below the chosen one, and what it fails.
#[derive(Debug, Clone, PartialEq)]
pub struct Rejected {
    /// The size.
    pub size: WireSize,
    /// The rule it fails.
    pub fails: DecidedBy,
    /// The ampacity by which it fails; `None` where it fails by size alone.
    pub ampacity: Option<Arc<Figure>>,
}

/// The smallest size of a run which satisfies every rule.
#[derive(Debug, Clone, PartialEq)]
pub enum ConductorChoice {
    /// A size fits.
    Chosen {
        /// The size.
        size: WireSize,
        /// The rule which decided it.
        decided_by: DecidedBy,
        /// The next smaller size.
        smaller: Option<Rejected>,
    },
    /// No size of the table fits.
    NoneFits {
        /// The largest size tried.
        largest: WireSize,
        /// What all its conductors carry.
        carries: Current,
        /// What they should carry.
        needed: Current,
    },
    /// The insulation may not be used in air so hot.
    TooHot,
    /// Aluminium inside the enclosure has no table.
    NoTable,
    /// The table has no cell in this column for any conductor which may be used here.
    NoCell {
        /// The column of the terminals.
        column: Column,
    },
}

/// The conductors of a run, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct Conductors {
    /// What was asked for.
    pub input: RunInput,
    /// Ampacity which the run must reach.
    pub required: Arc<Figure>,
    /// The smallest size which fits.
    pub choice: ConductorChoice,
    /// The installed size: as entered, or the smallest which fits, with its working.
    pub size: Option<Arc<Figure>>,
    /// Usable ampacity of all conductors of the installed size.
    pub ampacity: Option<Arc<Figure>>,
    /// Voltage drop.
    pub drop: Option<Arc<Figure>>,
    /// Voltage drop as a share of the supply voltage.
    pub drop_ratio: Option<Arc<Figure>>,
    /// Equipment grounding conductor.
    pub grounding: Option<Arc<Figure>>,
    /// Heat of the run, where it lies inside.
    pub heat: Option<Arc<Figure>>,
}

impl Conductors {
    /// The installed size.
    pub fn installed(&self) -> Option<WireSize> {
        match self.size.as_deref()?.value {
            Amount::Size(size) => Some(size),
            _ => None,
        }
    }

    /// The smallest size which fits.
    pub fn smallest(&self) -> Option<WireSize> {
        match self.choice {
            ConductorChoice::Chosen { size, .. } => Some(size),
            _ => None,
        }
    }

    /// Whether the installed size was entered.
    pub fn is_entered(&self) -> bool {
        self.size.as_ref().is_some_and(|figure| {
            figure
                .terms
                .iter()
                .any(|term| matches!(term.origin, Origin::Entered(Field::Run(_, RunField::Size))))
        })
    }
}

/// The ampacity which a run must reach, and the current it carries.
#[derive(Debug, Clone, PartialEq)]
pub struct Demand {
    /// Ampacity asked for: 125 per cent of a current, or a sum which holds it.
    pub ampacity: Arc<Figure>,
    /// The same without the 125 per cent, for the other reading of the corrected column.
    pub plain: Current,
    /// Current for drop and heat.
    pub carried: Given<Current>,
}

/// Sizes a run: the smallest size which satisfies every rule, and what follows from the installed size.
///
/// `None` only where the required figure is of another kind than a current, which no caller makes.
pub fn size_run(
    input: &RunInput,
    demand: &Demand,
    supply_voltage: &Given<Voltage>,
    notes: &mut Vec<MarginNote>,
) -> Option<Conductors> {
    let needed: Current = demand.ampacity.quantity()?;
    let choice = choose(input, needed, needed);
    note_choice(input, needed, &choice, notes);
    let size = installed_size(input, demand, &choice, notes);
    let ampacity = size
        .as_ref()
        .and_then(|(size, _)| usable(input, needed, *size));
    if let (Some(entered), Some(ampacity)) = (input.size, &ampacity) {
        note_entered(input, entered, needed, (ampacity, &choice), notes);
    }
    if let ConductorChoice::Chosen { size: taken, .. } = choice {
        note_other_reading(input, demand.plain, needed, taken, notes);
    }
    let size_figure = size.as_ref().map(|(_, figure)| Arc::clone(figure));
    let installed = size.map(|(size, _)| size);
    let drop = installed.and_then(|size| drop_of(input, demand, size, notes));
    let drop_ratio = drop.as_ref().and_then(|drop| {
        let volts: Voltage = drop.quantity()?;
        let ratio = volts / supply_voltage.value;
        Some(Arc::new(rules::DROP_RATIO.figure(
            ratio,
            [Term::of("dU", drop), supply_voltage.term("U")],
        )))
    });
    let heat = installed.and_then(|size| heat_of(input, demand, size));
    Some(Conductors {
        input: input.clone(),
        required: Arc::clone(&demand.ampacity),
        choice,
        size: size_figure,
        ampacity,
        drop,
        drop_ratio,
        grounding: None,
        heat,
    })
}

/// The demand of a conductor which carries one current: 125 per cent of it, by `rule`.
pub fn demand_of(rule: &'static Rule, symbol: &'static str, current: &Given<Current>) -> Demand {
    let ampacity = share_of(CONTINUOUS, current.value);
    Demand {
        ampacity: Arc::new(rule.figure(ampacity, [current.term(symbol)])),
        plain: current.value,
        carried: current.clone(),
    }
}

/// The 125 per cent of Article 430.
pub(crate) const CONTINUOUS: Ratio = Ratio::of_one(1.25);

/// The rows of ampacity tables from memory on which a run rests: whether it is inside, and the field cell's origin.
pub fn cells_from_memory(conductors: &Conductors) -> Option<(bool, WireSize)> {
    let size = conductors.installed()?;
    match conductors.input.surrounding {
        Surrounding::Inside { .. } => Some((true, size)),
        Surrounding::Field { .. } => ampacity_row(size)
            .filter(|row| row.known == Known::FromMemory)
            .map(|_| (false, size)),
    }
}
