//! Outcomes of the sizing in words: conductors, devices, reactors, totals, and why the next smaller size will not do.

use super::labels::run_where;
use super::units::{amount, apart, device, quantities_apart, quantity, sets, size};
use crate::sheet::UnitSystem;
use crate::sizing::conductor::{ConductorChoice, Conductors, DecidedBy, Rejected};
use crate::sizing::device::Device;
use crate::sizing::reactor::ReactorSize;
use crate::tables::Metal;
use crate::work::Total;

/// The metal of a conductor behind its size.
pub const fn metal(metal: Metal) -> &'static str {
    match metal {
        Metal::Copper => "Cu",
        Metal::Aluminium => "Al",
    }
}

/// The installed conductors of a run: `2 × 3/0 AWG Cu`; `None` where no size fits.
pub fn installed(conductors: &Conductors) -> Option<String> {
    conductors.installed().map(|wire| {
        format!(
            "{} {}",
            sets(conductors.input.sets.value, wire),
            metal(conductors.input.metal.value)
        )
    })
}

/// The rule which decided a size, as the end of `decided by`.
pub const fn decided_by(rule: DecidedBy) -> &'static str {
    match rule {
        DecidedBy::TerminalColumn => "the ampacity at the terminals",
        DecidedBy::CorrectedColumn => {
            "the ampacity of the insulation, corrected for ambient and count"
        }
        DecidedBy::SmallestWire => "the smallest wire which may be used",
        DecidedBy::ParallelMinimum => "1/0 AWG, with which conductors in parallel start",
    }
}

/// How the smallest size of a run was found: what decided it, and why the next smaller one will not do.
pub fn size_found(conductors: &Conductors, system: UnitSystem) -> String {
    match &conductors.choice {
        ConductorChoice::Chosen {
            size: wire,
            decided_by: rule,
            smaller,
        } => {
            let decided = format!(
                "{} is the smallest size which fits, decided by {}.",
                size(*wire),
                decided_by(*rule)
            );
            match smaller {
                Some(rejected) => format!("{decided} {}", why_not(rejected, conductors, system)),
                None => decided,
            }
        }
        ConductorChoice::NoneFits {
            largest,
            carries,
            needed,
        } => {
            let (carries, needed) = quantities_apart(*carries, *needed, system);
            format!(
                "No size fits: {} carries {carries}, and {needed} is asked for.",
                size(*largest)
            )
        }
        ConductorChoice::TooHot => format!(
            "No size fits: the air is too hot for the insulation {}.",
            run_where(conductors.input.run)
        ),
        ConductorChoice::NoTable => {
            "No size is given: aluminium inside the enclosure has no table.".to_owned()
        }
        ConductorChoice::NoCell { column } => format!(
            "No size is given: the {} °C column has no cell for conductors in parallel.",
            column.celsius()
        ),
    }
}

fn why_not(rejected: &Rejected, conductors: &Conductors, system: UnitSystem) -> String {
    let wire = size(rejected.size);
    match &rejected.ampacity {
        Some(ampacity) => {
            let (carries, needed) = apart(ampacity.value, conductors.required.value, system);
            format!("{wire} carries {carries}, and {needed} is asked for.")
        }
        None => format!("{wire} is smaller than that."),
    }
}

/// A branch device: `80 A time-delay fuse`; `None` where no rating is right.
pub fn branch_device(branch: &Device, system: UnitSystem) -> Option<String> {
    let rating = branch.rating.as_ref()?;
    Some(device(rating.value, branch.device.value, system))
}

/// A reactor: `3 %, 0.41 mH`.
pub fn reactor(reactor: &ReactorSize, system: UnitSystem) -> String {
    format!(
        "{}, {}",
        quantity(reactor.percent, system),
        amount(reactor.inductance.value, system)
    )
}

/// The values of a total as they are shown beside each other.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct TotalWords {
    /// Of what runs together.
    pub running: Option<String>,
    /// Of everything connected.
    pub connected: Option<String>,
    /// The limit.
    pub limit: Option<String>,
}

/// The values of a total with their units. Value and limit are told apart where they differ, however little.
pub fn total_words(total: &Total, system: UnitSystem) -> TotalWords {
    let connected = total.connected.map(|value| amount(value, system));
    match (total.running, total.limit) {
        (Some(running), Some(limit)) => {
            let (running, limit) = apart(running, limit, system);
            TotalWords {
                running: Some(running),
                connected,
                limit: Some(limit),
            }
        }
        (running, limit) => TotalWords {
            running: running.map(|value| amount(value, system)),
            connected,
            limit: limit.map(|value| amount(value, system)),
        },
    }
}
