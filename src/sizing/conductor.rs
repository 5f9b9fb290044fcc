//! Conductors of a run: the smallest size which satisfies every rule, and why the next smaller fails.

use crate::quantity::{Current, Length, Ratio, Temperature, WireSize};
use crate::tables::{Column, Conduit, Metal};
use crate::working::{Figure, Given, Run};
use std::sync::Arc;

/// Where a run lies, with what its rule needs.
#[derive(Debug, Clone, PartialEq)]
pub enum Surrounding {
    /// Inside the enclosure: UL 508A Table 28.1.
    Inside {
        /// Temperature of the air inside, where it is known.
        air: Option<Given<Temperature>>,
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
            crate::working::Amount::Size(size) => Some(size),
            _ => None,
        }
    }
}
