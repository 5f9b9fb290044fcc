//! The input reactor: whether practice asks for one, and what an entered one is.

use crate::math::reaches;
use crate::physics::circuit::{
    apparent_power, impedance_of_fault_current, impedance_on_base, reactor_inductance,
};
use crate::physics::heat::reactor_loss_by_motor;
use crate::quantity::{ApparentPower, Current, Frequency, Power, Ratio, ShaftPower, Voltage};
use crate::sizing::rules;
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind, ReactorReason, Term};
use std::sync::Arc;

/// A reactor of a percentage, entered or advised.
#[derive(Debug, Clone, PartialEq)]
pub struct ReactorSize {
    /// Its percentage.
    pub percent: Ratio,
    /// The current to which the percentage refers.
    pub reference: Given<Current>,
    /// Inductance of each phase.
    pub inductance: Arc<Figure>,
    /// Smallest rated current, RMS.
    pub rated_current: Arc<Figure>,
    /// Its heat: as entered, else assumed from motor power; `None` where neither is known.
    pub heat: Option<Given<Power>>,
}

/// The reactor of a feeder.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Reactor {
    /// The reasons of practice which the drive's own choke does not answer.
    pub reasons: Vec<ReactorReason>,
    /// Whether reasons stay open, because the power of the source is not known.
    pub is_open: bool,
    /// Ratio of the source's power to the drive's.
    pub source_ratio: Option<Arc<Figure>>,
    /// Source impedance on the drive's base.
    pub source_impedance: Option<Arc<Figure>>,
    /// The reactor which is entered: it counts.
    pub entered: Option<ReactorSize>,
    /// The reactor which practice advises: it counts nowhere until it is entered.
    pub advised: Option<ReactorSize>,
}

/// The current to which a percentage refers.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Reference {
    /// The drive's rated input current.
    DriveInput,
    /// The motor's full-load current.
    MotorCurrent,
    /// A current which is entered.
    Own,
}

/// What the supply brings to the question of a reactor.
#[derive(Debug, Clone, PartialEq)]
pub struct ReactorSupply {
    /// Voltage between lines.
    pub voltage: Given<Voltage>,
    /// Frequency.
    pub frequency: Given<Frequency>,
    /// Power of the source, where known.
    pub power: Option<Given<ApparentPower>>,
    /// Impedance of the source on its own base.
    pub impedance: Given<Ratio>,
    /// Fault current of the source, where entered: it answers for the impedance where no transformer is entered.
    pub fault: Option<Given<Current>>,
    /// Voltage unbalance at the panel.
    pub unbalance: Given<Ratio>,
    /// Switched capacitors on the bus.
    pub has_capacitors: bool,
    /// Surges expected.
    pub has_surges: bool,
}

/// What the drive brings to it.
#[derive(Debug, Clone, PartialEq)]
pub struct ReactorInput {
    /// The drive's rated input current.
    pub drive_input: Given<Current>,
    /// Motor full-load current.
    pub motor_current: Option<Given<Current>>,
    /// Motor power.
    pub motor_power: Option<Given<ShaftPower>>,
    /// Choke in the drive.
    pub choke: Given<Ratio>,
    /// Reactor, where entered; zero says that there is none.
    pub percent: Option<Given<Ratio>>,
    /// The current to which the percentage refers.
    pub reference: Reference,
    /// That current, where it is one of its own.
    pub own_reference: Option<Given<Current>>,
    /// Its loss, where entered.
    pub loss: Option<Given<Power>>,
}

/// A source at least this many times the drive asks for a reactor ...
const SOURCE_RATIO_LIMIT: f64 = 10.0;
/// ... where it has at least this power. Source: common practice of drive manuals, two of which agree.
const SOURCE_POWER_LIMIT: ApparentPower = ApparentPower::kilovolt_amperes(500.0);
/// Source impedance on the drive's base under which reactance is to be added.
const SOURCE_IMPEDANCE_LIMIT: Ratio = Ratio::per_cent(1.0);
/// Voltage unbalance from which practice asks for a reactor: published limits are 2 and 3 per cent, the lower is taken.
const UNBALANCE_LIMIT: Ratio = Ratio::per_cent(2.0);
/// A choke of this size in the drive answers source impedance and source power, never surges or capacitors.
pub const ANSWERING_CHOKE: Ratio = Ratio::per_cent(4.0);

/// Works whether practice asks for a reactor, and what the entered and the advised ones are.
pub fn reactor_of(
    input: &ReactorInput,
    supply: &ReactorSupply,
    notes: &mut Vec<MarginNote>,
) -> Reactor {
    let drive_power = Arc::new(rules::DRIVE_APPARENT_POWER.figure(
        apparent_power(supply.voltage.value, input.drive_input.value),
        [supply.voltage.term("U"), input.drive_input.term("I_in")],
    ));
    let (source_ratio, source_impedance) = source_figures(&drive_power, supply);
    let reasons = reasons(
        input,
        supply,
        source_ratio.as_ref(),
        source_impedance.as_ref(),
    );
    let advised_percent = advised_step(&reasons);
    let entered = input
        .percent
        .as_ref()
        .filter(|percent| percent.value > Ratio::of_one(0.0))
        .and_then(|percent| entered_size(percent, input, supply, notes));
    let on_drive_base = entered.as_ref().map(|size| on_base_of_drive(size, input));
    note_advice(input, (advised_percent, on_drive_base), &reasons, notes);
    if input.loss.is_some() && entered.is_none() {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::ReactorLoss,
            NoteKind::ReactorLossUnused,
        ));
    }
    let is_answered = on_drive_base
        .zip(advised_percent)
        .is_some_and(|(entered, advised)| reaches(entered.to_one(), advised.to_one()));
    let advised = advised_percent
        .filter(|_| !is_answered)
        .map(|percent| advised_size(percent, input, supply));
    Reactor {
        is_open: supply.power.is_none() && input.choke.value < ANSWERING_CHOKE,
        reasons,
        source_ratio,
        source_impedance,
        entered,
        advised,
    }
}

fn source_figures(
    drive_power: &Arc<Figure>,
    supply: &ReactorSupply,
) -> (Option<Arc<Figure>>, Option<Arc<Figure>>) {
    let Some(drive) = drive_power.quantity::<ApparentPower>() else {
        return (None, None);
    };
    let Some(source) = &supply.power else {
        let by_fault = supply.fault.as_ref();
        return (
            None,
            by_fault.map(|fault| impedance_by_fault(drive_power, drive, fault, supply)),
        );
    };
    let ratio = rules::SOURCE_RATIO.figure(
        source.value / drive,
        [source.term("S_t"), Term::of("S_d", drive_power)],
    );
    let impedance = rules::SOURCE_IMPEDANCE.figure(
        impedance_on_base(supply.impedance.value, source.value, drive),
        [
            supply.impedance.term("z_t"),
            Term::of("S_d", drive_power),
            source.term("S_t"),
        ],
    );
    (Some(Arc::new(ratio)), Some(Arc::new(impedance)))
}

fn impedance_by_fault(
    drive_power: &Arc<Figure>,
    drive: ApparentPower,
    fault: &Given<Current>,
    supply: &ReactorSupply,
) -> Arc<Figure> {
    let impedance = impedance_of_fault_current(drive, supply.voltage.value, fault.value);
    Arc::new(rules::SOURCE_IMPEDANCE_BY_FAULT.figure(
        impedance,
        [
            Term::of("S_d", drive_power),
            supply.voltage.term("U"),
            fault.term("I_sc"),
        ],
    ))
}

fn reasons(
    input: &ReactorInput,
    supply: &ReactorSupply,
    source_ratio: Option<&Arc<Figure>>,
    source_impedance: Option<&Arc<Figure>>,
) -> Vec<ReactorReason> {
    let has_answering_choke = input.choke.value >= ANSWERING_CHOKE;
    let is_large_source = source_ratio
        .and_then(|figure| figure.quantity::<Ratio>())
        .is_some_and(|ratio| ratio.to_one() >= SOURCE_RATIO_LIMIT)
        && supply
            .power
            .as_ref()
            .is_some_and(|power| power.value >= SOURCE_POWER_LIMIT);
    let is_stiff_source = source_impedance
        .and_then(|figure| figure.quantity::<Ratio>())
        .is_some_and(|impedance| impedance < SOURCE_IMPEDANCE_LIMIT);
    [
        (
            is_large_source && !has_answering_choke,
            ReactorReason::SourcePower,
        ),
        (
            is_stiff_source && !has_answering_choke,
            ReactorReason::SourceImpedance,
        ),
        (
            supply.unbalance.value >= UNBALANCE_LIMIT,
            ReactorReason::Unbalance,
        ),
        (supply.has_capacitors, ReactorReason::Capacitors),
        (supply.has_surges, ReactorReason::Surges),
    ]
    .into_iter()
    .filter_map(|(holds, reason)| holds.then_some(reason))
    .collect()
}

/// 3 per cent; 1.5 where only the source impedance asks for it.
fn advised_step(reasons: &[ReactorReason]) -> Option<Ratio> {
    match reasons {
        [] => None,
        [ReactorReason::SourceImpedance] => Some(Ratio::per_cent(1.5)),
        _ => Some(Ratio::per_cent(3.0)),
    }
}

/// The percentage of an entered reactor on the base of the drive's rated input current, on which advice is given.
fn on_base_of_drive(size: &ReactorSize, input: &ReactorInput) -> Ratio {
    size.percent * (input.drive_input.value / size.reference.value)
}

/// Says what practice asks for, beside the entered reactor on the drive's base.
fn note_advice(
    input: &ReactorInput,
    (advised, entered): (Option<Ratio>, Option<Ratio>),
    reasons: &[ReactorReason],
    notes: &mut Vec<MarginNote>,
) {
    let Some(advised) = advised else {
        return;
    };
    let reasons = reasons.to_vec();
    // Zero entered says that there is none: that too is below what is advised.
    let entered = entered.or_else(|| input.percent.as_ref().map(|_| Ratio::of_one(0.0)));
    let kind = match entered {
        None => NoteKind::ReactorAdvised {
            percent: advised,
            reasons,
        },
        Some(entered) if !reaches(entered.to_one(), advised.to_one()) => {
            NoteKind::ReactorBelowAdvice {
                entered,
                advised,
                reasons,
            }
        }
        Some(_) => return,
    };
    notes.push(MarginNote::new(Grade::Query, Field::ReactorPercent, kind));
}

fn entered_size(
    percent: &Given<Ratio>,
    input: &ReactorInput,
    supply: &ReactorSupply,
    notes: &mut Vec<MarginNote>,
) -> Option<ReactorSize> {
    let reference = match input.reference {
        Reference::DriveInput => Some(input.drive_input.clone()),
        Reference::MotorCurrent => input.motor_current.clone(),
        Reference::Own => input.own_reference.clone(),
    };
    let Some(reference) = reference else {
        notes.push(MarginNote::new(
            Grade::Query,
            Field::ReactorReferenceCurrent,
            NoteKind::ReactorReferenceMissing,
        ));
        return None;
    };
    let heat = input.loss.clone().or_else(|| assumed_heat(input));
    Some(size_of(percent, reference, heat, input, supply))
}

/// The advised reactor refers to the drive's rated input current, and its heat is the assumed one.
fn advised_size(percent: Ratio, input: &ReactorInput, supply: &ReactorSupply) -> ReactorSize {
    let percent = Given {
        value: percent,
        origin: crate::working::Origin::Constant,
    };
    size_of(
        &percent,
        input.drive_input.clone(),
        assumed_heat(input),
        input,
        supply,
    )
}

fn size_of(
    percent: &Given<Ratio>,
    reference: Given<Current>,
    heat: Option<Given<Power>>,
    input: &ReactorInput,
    supply: &ReactorSupply,
) -> ReactorSize {
    let inductance = reactor_inductance(
        percent.value,
        supply.voltage.value,
        supply.frequency.value,
        reference.value,
    );
    let inductance = rules::REACTOR_INDUCTANCE.figure(
        inductance,
        [
            percent.term("z"),
            supply.voltage.term("U"),
            supply.frequency.term("f"),
            reference.term("I_r"),
        ],
    );
    let rated_current =
        rules::REACTOR_CURRENT.figure(input.drive_input.value, [input.drive_input.term("I_in")]);
    ReactorSize {
        percent: percent.value,
        reference,
        inductance: Arc::new(inductance),
        rated_current: Arc::new(rated_current),
        heat,
    }
}

/// Half a per cent of motor power.
const ASSUMED_LOSS: Ratio = Ratio::per_cent(0.5);

fn assumed_heat(input: &ReactorInput) -> Option<Given<Power>> {
    let motor = input.motor_power.as_ref()?;
    let figure = rules::REACTOR_HEAT_ASSUMED.assumed_figure(
        reactor_loss_by_motor(ASSUMED_LOSS, motor.value),
        [Term::constant("p", ASSUMED_LOSS), motor.term("P_m")],
    );
    Given::from_figure(&Arc::new(figure))
}
