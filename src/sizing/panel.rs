//! The incoming circuit: running and connected current, incoming conductors, main device.

use crate::math::{agree, reaches};
use crate::quantity::{Current, Voltage};
use crate::sizing::conductor::{CONTINUOUS, Conductors, Demand, RunInput, size_run};
use crate::sizing::device::{DeviceInput, branch_for_main};
use crate::sizing::rules;
use crate::tables::nec_ratings::at_or_below;
use crate::tables::{DeviceType, Edition};
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, Rule, Term};
use std::sync::Arc;

/// The main device, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct MainDevice {
    /// Its type.
    pub device: Given<DeviceType>,
    /// Largest branch device and the motor currents of the others.
    pub sum: Arc<Figure>,
    /// The same sum with the drives' input currents for the others, for comparison.
    pub sum_by_inputs: Arc<Figure>,
    /// Largest standard rating not above the sum.
    pub largest: Option<Arc<Figure>>,
    /// The installed rating: as entered, or the largest.
    pub rating: Option<Given<Current>>,
}

/// The incoming circuit of the panel, worked.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct IncomingCircuit {
    /// Input currents of what runs together.
    pub running: Option<Arc<Figure>>,
    /// Input currents of everything connected.
    pub connected: Option<Arc<Figure>>,
    /// Ampacity for what is connected, beside the one the conductors are sized for.
    pub required_connected: Option<Arc<Figure>>,
    /// Incoming conductors, for what runs together.
    pub conductors: Option<Conductors>,
    /// Main device.
    pub main: Option<MainDevice>,
}

/// One drive feeder as the incoming circuit sees it.
#[derive(Debug, Clone, PartialEq)]
pub struct FeederLoad {
    /// Whether it runs together with the others.
    pub is_running: bool,
    /// The drive's rated input current.
    pub drive_input: Given<Current>,
    /// Motor full-load current.
    pub motor_current: Given<Current>,
    /// The branch device.
    pub device: DeviceInput,
}

/// Another load, whose current counts once.
#[derive(Debug, Clone, PartialEq)]
pub struct OtherLoad {
    /// Whether it runs together with the feeders.
    pub is_running: bool,
    /// Its current.
    pub current: Given<Current>,
}

/// What the incoming circuit is worked from.
#[derive(Debug, Clone, PartialEq)]
pub struct IncomingInput {
    /// Drive feeders.
    pub feeders: Vec<FeederLoad>,
    /// Other loads.
    pub others: Vec<OtherLoad>,
    /// Incoming run.
    pub run: RunInput,
    /// Supply voltage.
    pub voltage: Given<Voltage>,
    /// Type of the main device.
    pub main: Given<DeviceType>,
    /// Its rating, where entered.
    pub main_rating: Option<Given<Current>>,
    /// Edition.
    pub edition: Edition,
}

/// Works running and connected current, the incoming conductors and the main device.
///
/// What runs together is summed; the connected sums stand beside. A panel without load gives nothing.
pub fn incoming_circuit(input: &IncomingInput, notes: &mut Vec<MarginNote>) -> IncomingCircuit {
    let running = Loads::of(input, |is_running| is_running);
    let connected = Loads::of(input, |_| true);
    let running_figure = running.sum_of_inputs(&rules::RUNNING_CURRENT);
    let conductors =
        running
            .ampacity()
            .zip(running_figure.as_ref())
            .and_then(|(ampacity, carried)| {
                let demand = Demand {
                    ampacity,
                    plain: carried.quantity()?,
                    carried: Given::from_figure(carried)?,
                };
                size_run(&input.run, &demand, &input.voltage, notes)
            });
    IncomingCircuit {
        connected: connected.sum_of_inputs(&rules::CONNECTED_CURRENT),
        required_connected: connected.ampacity(),
        conductors,
        main: running_figure
            .as_ref()
            .and_then(|carried| main_device(input, &running, carried, notes)),
        running: running_figure,
    }
}

/// The loads which count in one sum.
struct Loads<'a> {
    feeders: Vec<&'a FeederLoad>,
    others: Vec<&'a OtherLoad>,
}

impl<'a> Loads<'a> {
    fn of(input: &'a IncomingInput, counts: impl Fn(bool) -> bool) -> Self {
        Self {
            feeders: input
                .feeders
                .iter()
                .filter(|load| counts(load.is_running))
                .collect(),
            others: input
                .others
                .iter()
                .filter(|load| counts(load.is_running))
                .collect(),
        }
    }

    fn sum_of_inputs(&self, rule: &'static Rule) -> Option<Arc<Figure>> {
        let terms: Vec<Term> = self
            .feeders
            .iter()
            .map(|load| load.drive_input.term("I_in"))
            .chain(self.others.iter().map(|load| load.current.term("I")))
            .collect();
        if terms.is_empty() {
            return None;
        }
        let sum: Current = self
            .feeders
            .iter()
            .map(|load| load.drive_input.value)
            .chain(self.others.iter().map(|load| load.current.value))
            .sum();
        Some(Arc::new(rule.figure(sum, terms)))
    }

    /// 125 per cent of the largest drive input, 100 per cent of all else. Source: NEC 2023, 409.20, 430.24, 430.122(D).
    fn ampacity(&self) -> Option<Arc<Figure>> {
        if self.feeders.is_empty() && self.others.is_empty() {
            return None;
        }
        let largest = position_of_largest(self.feeders.iter().map(|load| load.drive_input.value));
        let first = largest.and_then(|position| self.feeders.get(position));
        let others: Vec<(Current, Term)> = self
            .feeders
            .iter()
            .enumerate()
            .filter(|(position, _)| Some(*position) != largest)
            .map(|(_, load)| (load.drive_input.value, load.drive_input.term("I_in")))
            .chain(
                self.others
                    .iter()
                    .map(|load| (load.current.value, load.current.term("I"))),
            )
            .collect();
        let (rest, rest_figure) = sum_of(&rules::OTHER_INPUTS, others);
        let (largest_value, largest_term) = match first {
            Some(load) => (load.drive_input.value, load.drive_input.term("I_1")),
            None => {
                let none = Current::amperes(0.0);
                (none, Term::constant("I_1", none))
            }
        };
        let ampacity = CONTINUOUS * largest_value + rest;
        Some(Arc::new(rules::INCOMING_AMPACITY.figure(
            ampacity,
            [largest_term, Term::of("I_o", &rest_figure)],
        )))
    }
}

fn sum_of(rule: &'static Rule, parts: Vec<(Current, Term)>) -> (Current, Arc<Figure>) {
    let sum: Current = parts.iter().map(|(current, _)| *current).sum();
    let terms: Vec<Term> = parts.into_iter().map(|(_, term)| term).collect();
    (sum, Arc::new(rule.figure(sum, terms)))
}

/// The first of the largest currents.
fn position_of_largest(currents: impl Iterator<Item = Current>) -> Option<usize> {
    let mut found: Option<(usize, Current)> = None;
    for (position, current) in currents.enumerate() {
        if found.is_none_or(|(_, largest)| current > largest) {
            found = Some((position, current));
        }
    }
    found.map(|(position, _)| position)
}

/// Largest main device: largest branch device for its type and full-load currents of the others, rounded down.
///
/// Source: NEC 2023, 409.21(C), 430.62(A).
fn main_device(
    input: &IncomingInput,
    running: &Loads<'_>,
    carried: &Arc<Figure>,
    notes: &mut Vec<MarginNote>,
) -> Option<MainDevice> {
    let branches: Vec<(&FeederLoad, Current, Arc<Figure>)> = running
        .feeders
        .iter()
        .filter_map(|load| {
            let (rating, figure) = branch_for_main(input.main.value, &load.device, input.edition)?;
            Some((*load, rating, figure))
        })
        .collect();
    let largest = position_of_largest_branch(&branches)?;
    let (first, branch, branch_figure) = branches.get(largest)?;
    let branch_figure =
        Arc::new(rules::BRANCH_FOR_MAIN.figure(*branch, [Term::of("I_n", branch_figure)]));
    let rest: Vec<&&FeederLoad> = running
        .feeders
        .iter()
        .filter(|load| !std::ptr::eq(**load, *first))
        .collect();
    let sum_with = |current_of: fn(&FeederLoad) -> &Given<Current>, symbol: &'static str| {
        let parts = rest
            .iter()
            .map(|load| (current_of(load).value, current_of(load).term(symbol)))
            .chain(
                running
                    .others
                    .iter()
                    .map(|load| (load.current.value, load.current.term("I"))),
            )
            .collect();
        let (others, others_figure) = sum_of(&rules::OTHER_MOTORS, parts);
        Arc::new(rules::MAIN_SUM.figure(
            *branch + others,
            [
                Term::of("I_b", &branch_figure),
                Term::of("I_o", &others_figure),
            ],
        ))
    };
    let sum = sum_with(|load| &load.motor_current, "I_m");
    let sum_by_inputs = sum_with(|load| &load.drive_input, "I_in");
    let (largest, rating) = main_rating(input, &sum, carried, notes);
    Some(MainDevice {
        device: input.main.clone(),
        sum,
        sum_by_inputs,
        largest,
        rating,
    })
}

/// Equal largest devices: the one with the larger motor current counts as the largest.
fn position_of_largest_branch(branches: &[(&FeederLoad, Current, Arc<Figure>)]) -> Option<usize> {
    let mut found: Option<(usize, Current, Current)> = None;
    for (position, (load, rating, _)) in branches.iter().enumerate() {
        let motor = load.motor_current.value;
        let is_larger = found.is_none_or(|(_, largest, its_motor)| {
            *rating > largest
                || (agree(rating.to_amperes(), largest.to_amperes()) && motor > its_motor)
        });
        if is_larger {
            found = Some((position, *rating, motor));
        }
    }
    found.map(|(position, _, _)| position)
}

fn main_rating(
    input: &IncomingInput,
    sum: &Arc<Figure>,
    carried: &Arc<Figure>,
    notes: &mut Vec<MarginNote>,
) -> (Option<Arc<Figure>>, Option<Given<Current>>) {
    let Some(amperes) = sum.quantity::<Current>() else {
        return (None, None);
    };
    let largest = at_or_below(amperes, input.main.value, input.edition);
    if largest.is_none() {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                Field::MainType,
                NoteKind::NoMainFits { sum: amperes },
            )
            .about(sum),
        );
    }
    let largest_figure =
        largest.map(|rating| Arc::new(rules::MAIN_LARGEST.figure(rating, [Term::of("I_x", sum)])));
    if let (Some(entered), Some(most)) = (&input.main_rating, largest)
        && !reaches(most.to_amperes(), entered.value.to_amperes())
    {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                Field::MainRating,
                NoteKind::MainAboveMaximum {
                    entered: entered.value,
                    largest: most,
                },
            )
            .about(sum),
        );
    }
    let rating = input
        .main_rating
        .clone()
        .or_else(|| largest_figure.as_ref().and_then(Given::from_figure));
    if let (Some(rating), Some(running)) = (&rating, carried.quantity::<Current>())
        && !reaches(rating.value.to_amperes(), running.to_amperes())
    {
        notes.push(
            MarginNote::new(
                Grade::Query,
                Field::MainRating,
                NoteKind::MainBelowRunning {
                    rating: rating.value,
                    running,
                },
            )
            .about(carried),
        );
    }
    (largest_figure, rating)
}
