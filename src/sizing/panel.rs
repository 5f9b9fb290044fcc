//! The incoming circuit: running and connected current, incoming conductors, main device.

use crate::math::{agree, reaches};
use crate::quantity::{Current, Voltage};
use crate::sizing::conductor::{CONTINUOUS, Conductors, Demand, RunInput, size_run};
use crate::sizing::device::{DeviceInput, branch_for_main};
use crate::sizing::rules;
use crate::tables::nec_ratings::{at_or_below, is_standard};
use crate::tables::{DeviceType, Edition};
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, Rule, Term, sum_of_terms};
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
    /// Tag of the feeder.
    pub tag: Arc<str>,
    /// Whether it runs together with the others.
    pub is_running: bool,
    /// The drive's rated input current.
    pub drive_input: Given<Current>,
    /// What its branch device is sized from; `None` where no motor is known, so that the main device cannot count it.
    pub branch: Option<DeviceInput>,
}

/// Another load, whose current counts once.
#[derive(Debug, Clone, PartialEq)]
pub struct OtherLoad {
    /// Name of the load.
    pub name: Arc<str>,
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
            .map(|load| load.drive_input.term("I_in").belonging_to(&load.tag))
            .chain(
                self.others
                    .iter()
                    .map(|load| load.current.term("I").belonging_to(&load.name)),
            )
            .collect();
        (!terms.is_empty()).then(|| sum_of(rule, terms))
    }

    /// 125 per cent of the largest drive input, 100 per cent of all else. Source: NEC 2023, 409.20, 430.24, 430.122(D).
    fn ampacity(&self) -> Option<Arc<Figure>> {
        if self.feeders.is_empty() && self.others.is_empty() {
            return None;
        }
        let largest = position_of_largest(self.feeders.iter().map(|load| load.drive_input.value));
        let first = largest.and_then(|position| self.feeders.get(position));
        let others: Vec<Term> = self
            .feeders
            .iter()
            .enumerate()
            .filter(|(position, _)| Some(*position) != largest)
            .map(|(_, load)| load.drive_input.term("I_in").belonging_to(&load.tag))
            .chain(
                self.others
                    .iter()
                    .map(|load| load.current.term("I").belonging_to(&load.name)),
            )
            .collect();
        let rest_figure = sum_of(&rules::OTHER_INPUTS, others);
        let rest: Current = rest_figure.quantity()?;
        let (largest_value, largest_term) = match first {
            Some(load) => (
                load.drive_input.value,
                load.drive_input.term("I_1").belonging_to(&load.tag),
            ),
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

fn sum_of(rule: &'static Rule, terms: Vec<Term>) -> Arc<Figure> {
    let amperes = sum_of_terms(&terms);
    Arc::new(rule.figure(Current::amperes(amperes), terms))
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
    let branches: Vec<Branch<'_>> = running
        .feeders
        .iter()
        .filter_map(|load| Branch::of(load, input))
        .collect();
    let largest = position_of_largest_branch(&branches);
    let Some((largest, first, (rating, rating_figure))) = largest.and_then(|position| {
        let branch = branches.get(position)?;
        Some((position, branch, branch.rating.as_ref()?))
    }) else {
        // Without any motor there is nothing to protect, and the incoming sums say what they miss.
        if !branches.is_empty() {
            notes.push(MarginNote::new(
                Grade::Stop,
                Field::MainType,
                NoteKind::NoBranchForMain,
            ));
        }
        return None;
    };
    let branch_figure = Arc::new(rules::BRANCH_FOR_MAIN.figure(
        *rating,
        [Term::of("I_n", rating_figure).belonging_to(first.tag)],
    ));
    let sum_with = |current_of: fn(&Branch<'_>) -> Term| {
        let parts = branches
            .iter()
            .enumerate()
            .filter(|(position, _)| *position != largest)
            .map(|(_, branch)| current_of(branch))
            .chain(
                running
                    .others
                    .iter()
                    .map(|load| load.current.term("I").belonging_to(&load.name)),
            )
            .collect();
        let others = sum_of(&rules::OTHER_MOTORS, parts);
        let total = *rating + others.quantity().unwrap_or(Current::amperes(0.0));
        Arc::new(rules::MAIN_SUM.figure(
            total,
            [Term::of("I_b", &branch_figure), Term::of("I_o", &others)],
        ))
    };
    let sum = sum_with(|branch| branch.motor_current.term("I_m").belonging_to(branch.tag));
    let sum_by_inputs = sum_with(|branch| branch.drive_input.term("I_in").belonging_to(branch.tag));
    let (largest, rating) = main_rating(input, &sum, carried, notes);
    Some(MainDevice {
        device: input.main.clone(),
        sum,
        sum_by_inputs,
        largest,
        rating,
    })
}

/// A branch as the main device counts it.
struct Branch<'a> {
    tag: &'a Arc<str>,
    motor_current: &'a Given<Current>,
    drive_input: &'a Given<Current>,
    /// The largest device of the main's type which its drive may have; `None` where there is no such device, so that it
    /// counts among the others alone.
    rating: Option<(Current, Arc<Figure>)>,
}

impl<'a> Branch<'a> {
    fn of(load: &'a FeederLoad, input: &IncomingInput) -> Option<Self> {
        let branch = load.branch.as_ref()?;
        Some(Self {
            tag: &load.tag,
            motor_current: &branch.motor_current,
            drive_input: &load.drive_input,
            rating: branch_for_main(input.main.value, branch, input.edition),
        })
    }
}

/// Equal largest devices: the one with the larger motor current counts as the largest.
fn position_of_largest_branch(branches: &[Branch<'_>]) -> Option<usize> {
    let mut found: Option<(usize, Current, Current)> = None;
    for (position, branch) in branches.iter().enumerate() {
        let Some((rating, _)) = branch.rating else {
            continue;
        };
        let motor = branch.motor_current.value;
        let is_larger = found.is_none_or(|(_, largest, its_motor)| {
            rating > largest
                || (agree(rating.to_amperes(), largest.to_amperes()) && motor > its_motor)
        });
        if is_larger {
            found = Some((position, rating, motor));
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
    if let Some(entered) = &input.main_rating
        && !is_standard(entered.value, input.main.value, input.edition)
    {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::MainRating,
            NoteKind::DeviceNotStandard {
                entered: entered.value,
            },
        ));
    }
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
