//! One feeder: its currents, conductors, device, reactor and heat.

use super::WorkedFeeder;
use crate::assume::{AssumedValue, Assumption, FeederInputs, Site, feeder as filled};
use crate::math::reaches;
use crate::quantity::{Current, Power, Ratio, Temperature};
use crate::sheet::Item;
use crate::sizing::conductor::{Conductors, demand_of, size_run};
use crate::sizing::current::{DriveInputBasis, drive_input, motor_full_load};
use crate::sizing::device::{Device, DeviceInput, disconnect, size_branch_device};
use crate::sizing::grounding::grounding_of;
use crate::sizing::heat::{FeederHeat, assumed_device_loss, drive_loss, loss_inside, sum_of_heats};
use crate::sizing::panel::FeederLoad;
use crate::sizing::reactor::{Reactor, ReactorInput, Reference, reactor_of};
use crate::sizing::rules;
use crate::working::{
    Amount, Field, Figure, Given, Grade, Holder, HolderId, Ink, MarginNote, NoteKind, Place, Run,
    RunField, Term,
};
use std::sync::Arc;

/// A feeder, worked, with what its result depends on.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Feeder {
    pub(super) worked: Arc<WorkedFeeder>,
    /// What the incoming circuit sees of it; `None` where currents are missing.
    pub(super) load: Option<FeederLoad>,
    /// Limits of the drive, against which the enclosure's air and the site are held.
    pub(super) inputs: FeederInputs,
    /// The band of air inside for which the choices hold; `None` where the air inside is not known.
    pub(super) air_band: Option<Temperature>,
}

/// Works one feeder for air inside in the band which ends at `air_band`.
pub(super) fn work_feeder(item: &Item, site: &Site, air_band: Option<Temperature>) -> Feeder {
    let inputs = filled(item, site, air_band);
    let mut notes = Vec::new();
    let parts = parts_of(&inputs, site, &mut notes);
    let holder = Holder::Feeder(item.id);
    let load = load_of(item.id, &inputs, &parts);
    let mut notes: Vec<MarginNote> = notes.into_iter().map(|note| note.held_by(holder)).collect();
    notes.sort_by_key(|note| note.grade);
    let mut assumptions = inputs.assumptions.clone();
    assumptions.extend(assumed_by_rules(holder, &parts));
    let worked = WorkedFeeder {
        id: item.id,
        tag: inputs.tag.clone(),
        load: inputs.load.clone(),
        is_running: inputs.is_running,
        motor_current: parts.motor_current,
        drive_input: parts.drive_input,
        ahead: parts.ahead,
        behind: parts.behind,
        drop_ratio: parts.drop_ratio,
        device: parts.device,
        disconnect: parts.disconnect,
        reactor: parts.reactor,
        heat: parts.heat,
        short_circuit_rating: inputs.short_circuit_rating.clone(),
        assumptions,
        notes,
    };
    Feeder {
        worked: Arc::new(worked),
        load,
        inputs,
        air_band,
    }
}

/// What rules filled in: the drive's rated input current, and losses without data.
fn assumed_by_rules(holder: Holder, parts: &Parts) -> Vec<Assumption> {
    let heat = &parts.heat;
    [
        assumed_by_rule(holder, Field::DriveInput, parts.drive_input.as_ref()),
        assumed_by_rule(holder, Field::DriveLoss, heat.drive.as_ref()),
        assumed_by_rule(holder, Field::DeviceLoss, heat.device.as_ref()),
        assumed_by_rule(holder, Field::ReactorLoss, heat.reactor.as_ref()),
    ]
    .into_iter()
    .flatten()
    .collect()
}

/// The assumption of a value which a rule filled in for `field`; `None` where it was entered.
pub(super) fn assumed_by_rule<T: Copy + Into<Amount>>(
    holder: Holder,
    field: Field,
    given: Option<&Given<T>>,
) -> Option<Assumption> {
    let given = given.filter(|given| given.ink() == Ink::Assumed)?;
    Some(Assumption {
        place: Place { holder, field },
        value: AssumedValue::Amount(given.value.into()),
    })
}

/// What is worked of a feeder, piece by piece.
#[derive(Default)]
struct Parts {
    motor_current: Option<Given<Current>>,
    drive_input: Option<Given<Current>>,
    ahead: Option<Conductors>,
    behind: Option<Conductors>,
    drop_ratio: Option<Arc<Figure>>,
    device: Option<Device>,
    disconnect: Option<Arc<Figure>>,
    reactor: Reactor,
    heat: FeederHeat,
}

fn parts_of(inputs: &FeederInputs, site: &Site, notes: &mut Vec<MarginNote>) -> Parts {
    let is_without_load = inputs.motor_power.is_none()
        && inputs.motor_current.is_none()
        && inputs.drive_input.is_none();
    if is_without_load {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::MotorPower,
            NoteKind::NoLoad,
        ));
        return Parts::default();
    }
    let Some(supply) = &site.supply else {
        return unsupplied(inputs, notes);
    };
    let voltage = &supply.voltage;
    let motor_current = motor_full_load(
        inputs.motor_power.as_ref(),
        inputs.motor_current.as_ref(),
        voltage,
        notes,
    );
    let drive_input = match &motor_current {
        Some(motor_current) => drive_input(
            inputs.drive_input.as_ref(),
            &DriveInputBasis {
                power: inputs.motor_power.as_ref(),
                motor_current,
                voltage,
                smoothing: smoothing(inputs, motor_current),
            },
            notes,
        ),
        None => inputs.drive_input.clone(),
    };
    let mut ahead = drive_input.as_ref().and_then(|current| {
        let demand = demand_of(&rules::INPUT_AMPACITY, "I_in", current);
        size_run(&inputs.ahead, &demand, voltage, notes)
    });
    let mut behind = motor_current.as_ref().and_then(|current| {
        let demand = demand_of(&rules::OUTPUT_AMPACITY, "I_m", current);
        size_run(&inputs.behind, &demand, voltage, notes)
    });
    let device = motor_current.as_ref().map(|motor_current| {
        size_branch_device(
            &device_input(inputs, motor_current, drive_input.as_ref()),
            site.basis.edition(),
            notes,
        )
    });
    if let Some(rating) = device.as_ref().and_then(|device| device.rating.as_ref()) {
        for conductors in [&mut ahead, &mut behind].into_iter().flatten() {
            conductors.grounding = grounding_of(conductors, rating, notes);
        }
    }
    let reactor = drive_input
        .as_ref()
        .map_or_else(Reactor::default, |drive_input| {
            reactor_of(
                &reactor_input(inputs, drive_input, motor_current.as_ref()),
                supply,
                notes,
            )
        });
    let drop_ratio = drop_of_both(ahead.as_ref(), behind.as_ref(), notes);
    let heat = heat_of(
        inputs,
        &HeatBasis {
            drive_input: drive_input.as_ref(),
            device: device.as_ref(),
            reactor: &reactor,
            runs: [ahead.as_ref(), behind.as_ref()],
        },
        notes,
    );
    Parts {
        disconnect: drive_input.as_ref().map(disconnect),
        motor_current,
        drive_input,
        ahead,
        behind,
        drop_ratio,
        device,
        reactor,
        heat,
    }
}

/// Without a supply voltage nothing is sized, but what is known of the heat counts.
fn unsupplied(inputs: &FeederInputs, notes: &mut Vec<MarginNote>) -> Parts {
    let nothing = HeatBasis {
        drive_input: None,
        device: None,
        reactor: &Reactor::default(),
        runs: [None, None],
    };
    let heat = heat_of(inputs, &nothing, notes);
    Parts {
        heat,
        ..Parts::default()
    }
}

/// The larger of the drive's choke and the entered reactor, on a base not above the drive's input current.
///
/// A percentage of the motor's current is at least as much of the drive's; one of another current is brought to the
/// motor's, so that no reactor counts for more than it is.
fn smoothing(inputs: &FeederInputs, motor_current: &Given<Current>) -> Ratio {
    let reactor = inputs
        .reactor
        .as_ref()
        .map(|percent| match inputs.reference {
            Reference::DriveInput | Reference::MotorCurrent => percent.value,
            Reference::Own => match &inputs.own_reference {
                Some(own) if own.value > motor_current.value => {
                    percent.value * (motor_current.value / own.value)
                }
                Some(_) => percent.value,
                None => Ratio::of_one(0.0),
            },
        });
    match reactor {
        Some(reactor) if reactor > inputs.choke.value => reactor,
        _ => inputs.choke.value,
    }
}

fn device_input(
    inputs: &FeederInputs,
    motor_current: &Given<Current>,
    drive_input: Option<&Given<Current>>,
) -> DeviceInput {
    DeviceInput {
        device: inputs.device.clone(),
        motor_current: motor_current.clone(),
        drive_input: drive_input.cloned(),
        permitted: inputs.permitted.clone(),
        largest: inputs.largest.clone(),
        rating: inputs.device_rating.clone(),
    }
}

fn reactor_input(
    inputs: &FeederInputs,
    drive_input: &Given<Current>,
    motor_current: Option<&Given<Current>>,
) -> ReactorInput {
    ReactorInput {
        drive_input: drive_input.clone(),
        motor_current: motor_current.cloned(),
        motor_power: inputs.motor_power.clone(),
        choke: inputs.choke.clone(),
        percent: inputs.reactor.clone(),
        reference: inputs.reference,
        own_reference: inputs.own_reference.clone(),
        loss: inputs.reactor_loss.clone(),
    }
}

/// Drop which is advised at most for a branch circuit. Source: NEC 2023, 210.19(A), informational note: advice, no rule.
const ADVISED_DROP: Ratio = Ratio::per_cent(3.0);

fn drop_of_both(
    ahead: Option<&Conductors>,
    behind: Option<&Conductors>,
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    let runs: Vec<&Conductors> = [ahead, behind].into_iter().flatten().collect();
    for run in &runs {
        if run.input.length.is_none() {
            let part = Field::Run(run.input.run, RunField::Length);
            let kind = NoteKind::LengthMissing { run: run.input.run };
            notes.push(MarginNote::new(Grade::Query, part, kind));
        }
    }
    // The drop of one run alone would read as that of both.
    let parts: Vec<&Arc<Figure>> = runs
        .iter()
        .map(|conductors| conductors.drop_ratio.as_ref())
        .collect::<Option<_>>()?;
    if parts.is_empty() {
        return None;
    }
    let sum: f64 = parts
        .iter()
        .filter_map(|figure| figure.quantity::<Ratio>())
        .map(Ratio::to_one)
        .sum();
    let drop = Ratio::of_one(sum);
    let terms: Vec<Term> = parts
        .into_iter()
        .map(|figure| Term::of("d", figure))
        .collect();
    let figure = Arc::new(rules::DROP_BOTH.figure(drop, terms));
    if !reaches(ADVISED_DROP.to_one(), drop.to_one()) {
        notes.push(
            MarginNote::new(
                Grade::Note,
                Field::Run(Run::Behind, RunField::Size),
                NoteKind::DropAboveAdvice {
                    drop,
                    advised: ADVISED_DROP,
                },
            )
            .about(&figure),
        );
    }
    Some(figure)
}

/// What the heat of a feeder rests on.
struct HeatBasis<'a> {
    drive_input: Option<&'a Given<Current>>,
    device: Option<&'a Device>,
    reactor: &'a Reactor,
    runs: [Option<&'a Conductors>; 2],
}

fn heat_of(
    inputs: &FeederInputs,
    basis: &HeatBasis<'_>,
    notes: &mut Vec<MarginNote>,
) -> FeederHeat {
    let drive = drive_loss(inputs.drive_loss.clone(), inputs.motor_power.as_ref());
    let drive_inside = drive
        .as_ref()
        .map(|loss| loss_inside(loss, &inputs.heatsink_share));
    let reactor = basis
        .reactor
        .entered
        .as_ref()
        .and_then(|size| size.heat.clone());
    let device = match (
        basis.device.and_then(|device| device.rating.as_ref()),
        basis.drive_input,
    ) {
        (Some(rating), Some(current)) => {
            let assumed = || assumed_device_loss(inputs.device.value, rating, current);
            let loss = inputs.device_loss.clone().or_else(assumed);
            if loss.is_none() {
                notes.push(MarginNote::new(
                    Grade::Query,
                    Field::DeviceLoss,
                    NoteKind::DeviceLossUnknown {
                        rating: rating.value,
                    },
                ));
            }
            loss
        }
        _ => inputs.device_loss.clone(),
    };
    let runs: Vec<Term> = basis
        .runs
        .into_iter()
        .flatten()
        .filter_map(|conductors| conductors.heat.as_ref())
        .map(|figure| Term::of("P", figure))
        .collect();
    let conductors = (!runs.is_empty()).then(|| sum_of_heats(&rules::CONDUCTOR_HEAT, runs));
    let parts: Vec<Term> = [
        drive_inside.as_ref().map(|figure| Term::of("P", figure)),
        conductors.as_ref().map(|figure| Term::of("P", figure)),
    ]
    .into_iter()
    .chain([&reactor, &device].map(|part| part.as_ref().map(|loss: &Given<Power>| loss.term("P"))))
    .flatten()
    .collect();
    let total = (!parts.is_empty()).then(|| sum_of_heats(&rules::FEEDER_HEAT, parts));
    FeederHeat {
        drive,
        drive_inside,
        reactor,
        device,
        conductors,
        total,
    }
}

/// A feeder's tag, or its number in the sheet where it has none.
pub(super) fn shown_tag(tag: &str, id: HolderId) -> Arc<str> {
    if tag.is_empty() {
        format!("#{}", id.0).into()
    } else {
        tag.into()
    }
}

fn load_of(id: HolderId, inputs: &FeederInputs, parts: &Parts) -> Option<FeederLoad> {
    let drive_input = parts.drive_input.as_ref()?;
    let branch = parts
        .motor_current
        .as_ref()
        .map(|motor_current| device_input(inputs, motor_current, Some(drive_input)));
    Some(FeederLoad {
        tag: shown_tag(&inputs.tag, id),
        is_running: inputs.is_running,
        drive_input: drive_input.clone(),
        branch,
    })
}

impl WorkedFeeder {
    /// The runs of the feeder which were worked.
    pub fn runs(&self) -> impl Iterator<Item = &Conductors> {
        [&self.ahead, &self.behind].into_iter().flatten()
    }
}
