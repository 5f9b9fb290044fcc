//! Feeders: currents, conductors, device, reactor, heat.

use super::value::{Value, Writer};
use serde::Serialize;
use ventrail::sizing::conductor::{
    ConductorChoice, Conductors, DecidedBy, Rejected, RunInput, Surrounding,
};
use ventrail::sizing::heat::FeederHeat;
use ventrail::sizing::reactor::{Reactor, ReactorSize};
use ventrail::tables::{DeviceType, Metal};
use ventrail::words;
use ventrail::work::WorkedFeeder;
use ventrail::working::{Origin, ReactorReason};

#[derive(Serialize)]
pub struct Feeder<'a> {
    id: u32,
    tag: String,
    load: String,
    is_running: bool,
    #[serde(skip_serializing_if = "Option::is_none")]
    motor_current: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    drive_input: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    ahead: Option<Run<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    behind: Option<Run<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    drop_ratio: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    device: Option<Device<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    disconnect: Option<Value<'a>>,
    reactor: ReactorLine<'a>,
    heat: Heat<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    short_circuit_rating: Option<Value<'a>>,
}

#[derive(Serialize)]
pub struct Run<'a> {
    place: &'static str,
    metal: &'static str,
    sets: u32,
    outcome: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    smallest: Option<&'static str>,
    #[serde(skip_serializing_if = "Option::is_none")]
    decided_by: Option<&'static str>,
    #[serde(skip_serializing_if = "Option::is_none")]
    smaller: Option<Smaller<'a>>,
    found: String,
    required: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    size: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    ampacity: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    drop: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    drop_ratio: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    grounding: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    heat: Option<Value<'a>>,
}

#[derive(Serialize)]
struct Smaller<'a> {
    size: &'static str,
    fails: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    ampacity: Option<Value<'a>>,
}

#[derive(Serialize)]
struct Device<'a> {
    r#type: &'static str,
    product: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    largest: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    rating: Option<Value<'a>>,
}

#[derive(Serialize)]
struct ReactorLine<'a> {
    reasons: Vec<&'static str>,
    is_open: bool,
    #[serde(skip_serializing_if = "Option::is_none")]
    source_ratio: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    source_impedance: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    entered: Option<ReactorData<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    advised: Option<ReactorData<'a>>,
}

#[derive(Serialize)]
struct ReactorData<'a> {
    percent: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    reference: Option<Value<'a>>,
    inductance: Value<'a>,
    rated_current: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    heat: Option<Value<'a>>,
}

#[derive(Serialize)]
struct Heat<'a> {
    #[serde(skip_serializing_if = "Option::is_none")]
    drive: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    drive_inside: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    reactor: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    device: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    conductors: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    total: Option<Value<'a>>,
}

/// A feeder; its assumptions and notes stand in the lists of the sheet.
pub fn feeder<'a>(worked: &'a WorkedFeeder, writer: Writer) -> Feeder<'a> {
    let WorkedFeeder {
        id,
        tag,
        load,
        is_running,
        motor_current,
        drive_input,
        ahead,
        behind,
        drop_ratio,
        device: of_feeder,
        disconnect,
        reactor: of_reactor,
        heat: of_heat,
        short_circuit_rating,
        assumptions: _,
        notes: _,
    } = worked;
    Feeder {
        id: id.0,
        tag: tag.clone(),
        load: load.clone(),
        is_running: *is_running,
        motor_current: writer.given(motor_current.as_ref()),
        drive_input: writer.given(drive_input.as_ref()),
        ahead: ahead.as_ref().map(|conductors| run(conductors, writer)),
        behind: behind.as_ref().map(|conductors| run(conductors, writer)),
        drop_ratio: writer.maybe(drop_ratio.as_ref()),
        device: of_feeder.as_ref().map(|worked| device(worked, writer)),
        disconnect: writer.maybe(disconnect.as_ref()),
        reactor: reactor(of_reactor, writer),
        heat: heat(of_heat, writer),
        short_circuit_rating: writer.given(short_circuit_rating.as_ref()),
    }
}

/// The conductors of a run.
pub fn run<'a>(conductors: &'a Conductors, writer: Writer) -> Run<'a> {
    let Conductors {
        input,
        required,
        choice,
        size,
        ampacity,
        drop,
        drop_ratio,
        grounding,
        heat,
    } = conductors;
    let RunInput {
        surrounding,
        metal,
        sets,
        ..
    } = input;
    let (outcome, decision) = match choice {
        ConductorChoice::Chosen {
            decided_by,
            smaller,
            ..
        } => ("chosen", Some((*decided_by, smaller.as_ref()))),
        ConductorChoice::NoneFits { .. } => ("none_fits", None),
        ConductorChoice::TooHot => ("too_hot", None),
        ConductorChoice::NoTable => ("no_table", None),
        ConductorChoice::NoCell { .. } => ("no_cell", None),
    };
    Run {
        place: match surrounding {
            Surrounding::Inside { .. } => "inside",
            Surrounding::Field { .. } => "field",
        },
        metal: match metal.value {
            Metal::Copper => "copper",
            Metal::Aluminium => "aluminium",
        },
        sets: sets.value,
        outcome,
        smallest: conductors.smallest().map(ventrail::file::size_name),
        decided_by: decision.map(|(rule, _)| decided(rule)),
        smaller: decision
            .and_then(|(_, rejected)| rejected)
            .map(|rejected| smaller(rejected, writer)),
        found: words::size_found(conductors, writer.system),
        required: writer.figure(required),
        size: writer.maybe(size.as_ref()),
        ampacity: writer.maybe(ampacity.as_ref()),
        drop: writer.maybe(drop.as_ref()),
        drop_ratio: writer.maybe(drop_ratio.as_ref()),
        grounding: writer.maybe(grounding.as_ref()),
        heat: writer.maybe(heat.as_ref()),
    }
}

fn smaller<'a>(rejected: &'a Rejected, writer: Writer) -> Smaller<'a> {
    let Rejected {
        size,
        fails,
        ampacity,
    } = rejected;
    Smaller {
        size: ventrail::file::size_name(*size),
        fails: decided(*fails),
        ampacity: writer.maybe(ampacity.as_ref()),
    }
}

fn decided(rule: DecidedBy) -> &'static str {
    match rule {
        DecidedBy::TerminalColumn => "terminal_column",
        DecidedBy::CorrectedColumn => "corrected_column",
        DecidedBy::SmallestWire => "smallest_wire",
        DecidedBy::ParallelMinimum => "parallel_minimum",
    }
}

/// The name of a type of device.
pub fn device_type(device: DeviceType) -> &'static str {
    match device {
        DeviceType::TimeDelayFuse => "time_delay_fuse",
        DeviceType::NontimeDelayFuse => "nontime_delay_fuse",
        DeviceType::ClassCcFuse => "class_cc_fuse",
        DeviceType::InverseTimeBreaker => "inverse_time_breaker",
    }
}

fn device<'a>(worked: &'a ventrail::sizing::device::Device, writer: Writer) -> Device<'a> {
    let ventrail::sizing::device::Device {
        device,
        product,
        largest,
        rating,
    } = worked;
    Device {
        r#type: device_type(device.value),
        product: writer.figure(product),
        largest: writer.maybe(largest.as_ref()),
        rating: writer.given(rating.as_ref()),
    }
}

fn reactor<'a>(worked: &'a Reactor, writer: Writer) -> ReactorLine<'a> {
    let Reactor {
        reasons,
        is_open,
        source_ratio,
        source_impedance,
        entered,
        advised,
    } = worked;
    ReactorLine {
        reasons: reasons.iter().map(|reason| reason_name(*reason)).collect(),
        is_open: *is_open,
        source_ratio: writer.maybe(source_ratio.as_ref()),
        source_impedance: writer.maybe(source_impedance.as_ref()),
        entered: entered.as_ref().map(|size| reactor_data(size, writer)),
        advised: advised.as_ref().map(|size| reactor_data(size, writer)),
    }
}

fn reason_name(reason: ReactorReason) -> &'static str {
    match reason {
        ReactorReason::SourcePower => "source_power",
        ReactorReason::SourceImpedance => "source_impedance",
        ReactorReason::Unbalance => "unbalance",
        ReactorReason::Capacitors => "capacitors",
        ReactorReason::Surges => "surges",
    }
}

fn reactor_data<'a>(size: &'a ReactorSize, writer: Writer) -> ReactorData<'a> {
    let ReactorSize {
        percent,
        reference,
        inductance,
        rated_current,
        heat,
    } = size;
    let percent_origin = inductance
        .terms
        .iter()
        .find(|term| term.symbol == "z")
        .map_or(&Origin::Constant, |term| &term.origin);
    ReactorData {
        percent: writer.from((*percent).into(), percent_origin),
        reference: writer.given(Some(reference)),
        inductance: writer.figure(inductance),
        rated_current: writer.figure(rated_current),
        heat: writer.given(heat.as_ref()),
    }
}

fn heat<'a>(worked: &'a FeederHeat, writer: Writer) -> Heat<'a> {
    let FeederHeat {
        drive,
        drive_inside,
        reactor,
        device,
        conductors,
        total,
    } = worked;
    Heat {
        drive: writer.given(drive.as_ref()),
        drive_inside: writer.maybe(drive_inside.as_ref()),
        reactor: writer.given(reactor.as_ref()),
        device: writer.given(device.as_ref()),
        conductors: writer.maybe(conductors.as_ref()),
        total: writer.maybe(total.as_ref()),
    }
}
