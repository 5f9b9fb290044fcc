//! The panel and its enclosure: incoming circuit, fault current, heat ledger, air.

use super::feeder::{Run, device_type, run};
use super::value::{Value, Writer};
use serde::Serialize;
use ventrail::sizing;
use ventrail::sizing::panel::{IncomingCircuit, MainDevice};
use ventrail::work::{self, LedgerGroup, WorkedEnclosure};

#[derive(Serialize)]
pub struct Incoming<'a> {
    #[serde(skip_serializing_if = "Option::is_none")]
    running: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    connected: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    required_connected: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    conductors: Option<Run<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    main: Option<Main<'a>>,
}

#[derive(Serialize)]
struct Main<'a> {
    r#type: &'static str,
    sum: Value<'a>,
    sum_by_inputs: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    largest: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    rating: Option<Value<'a>>,
}

#[derive(Serialize)]
pub struct Fault<'a> {
    #[serde(skip_serializing_if = "Option::is_none")]
    transformer_current: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    at_source: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    run_factor: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    multiplier: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    at_panel: Option<Value<'a>>,
}

#[derive(Serialize)]
pub struct Ledger<'a> {
    rows: Vec<LedgerRow<'a>>,
    running: Value<'a>,
    connected: Value<'a>,
    #[serde(skip_serializing_if = "Option::is_none")]
    advised_reactors: Option<Value<'a>>,
}

#[derive(Serialize)]
struct LedgerRow<'a> {
    group: &'static str,
    sources: u32,
    running: Value<'a>,
    connected: Value<'a>,
}

#[derive(Serialize)]
pub struct Enclosure<'a> {
    is_ventilated: bool,
    ambient: Value<'a>,
    limit: Value<'a>,
    air: Air<'a>,
    air_connected: Air<'a>,
}

#[derive(Serialize)]
struct Air<'a> {
    #[serde(skip_serializing_if = "Option::is_none")]
    surface: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    conductance: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    sealed_rise: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    sealed_inside: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    inside: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    pressure: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    density: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    airflow: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    airflow_credited: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    airflow_metric_rule: Option<Value<'a>>,
    #[serde(skip_serializing_if = "Option::is_none")]
    airflow_us_rule: Option<Value<'a>>,
}

/// The incoming circuit.
pub fn incoming<'a>(worked: &'a IncomingCircuit, writer: Writer) -> Incoming<'a> {
    let IncomingCircuit {
        running,
        connected,
        required_connected,
        conductors,
        main: of_panel,
    } = worked;
    Incoming {
        running: writer.maybe(running.as_ref()),
        connected: writer.maybe(connected.as_ref()),
        required_connected: writer.maybe(required_connected.as_ref()),
        conductors: conductors
            .as_ref()
            .map(|conductors| run(conductors, writer)),
        main: of_panel.as_ref().map(|worked| main(worked, writer)),
    }
}

fn main<'a>(worked: &'a MainDevice, writer: Writer) -> Main<'a> {
    let MainDevice {
        device,
        sum,
        sum_by_inputs,
        largest,
        rating,
    } = worked;
    Main {
        r#type: device_type(device.value),
        sum: writer.figure(sum),
        sum_by_inputs: writer.figure(sum_by_inputs),
        largest: writer.maybe(largest.as_ref()),
        rating: writer.given(rating.as_ref()),
    }
}

/// The fault current.
pub fn fault<'a>(worked: &'a sizing::fault::Fault, writer: Writer) -> Fault<'a> {
    let sizing::fault::Fault {
        transformer_current,
        at_source,
        run_factor,
        multiplier,
        at_panel,
    } = worked;
    Fault {
        transformer_current: writer.maybe(transformer_current.as_ref()),
        at_source: writer.given(at_source.as_ref()),
        run_factor: writer.maybe(run_factor.as_ref()),
        multiplier: writer.maybe(multiplier.as_ref()),
        at_panel: writer.given(at_panel.as_ref()),
    }
}

/// The heat ledger.
pub fn ledger<'a>(worked: &'a work::Ledger, writer: Writer) -> Ledger<'a> {
    let work::Ledger {
        rows,
        running,
        connected,
        advised_reactors,
    } = worked;
    Ledger {
        rows: rows.iter().map(|row| ledger_row(row, writer)).collect(),
        running: writer.figure(running),
        connected: writer.figure(connected),
        advised_reactors: writer.maybe(advised_reactors.as_ref()),
    }
}

fn ledger_row<'a>(row: &'a work::LedgerRow, writer: Writer) -> LedgerRow<'a> {
    let work::LedgerRow {
        group,
        sources,
        running,
        connected,
    } = row;
    LedgerRow {
        group: match group {
            LedgerGroup::Drives => "drives",
            LedgerGroup::Reactors => "reactors",
            LedgerGroup::Devices => "devices",
            LedgerGroup::Conductors => "conductors",
            LedgerGroup::Others => "others",
            LedgerGroup::Sun => "sun",
        },
        sources: *sources,
        running: writer.figure(running),
        connected: writer.figure(connected),
    }
}

/// The enclosure.
pub fn enclosure<'a>(worked: &'a WorkedEnclosure, writer: Writer) -> Enclosure<'a> {
    let WorkedEnclosure {
        is_ventilated,
        ambient,
        limit,
        air: running,
        air_connected,
    } = worked;
    Enclosure {
        is_ventilated: *is_ventilated,
        ambient: writer.from(ambient.value.into(), &ambient.origin),
        limit: writer.from(limit.value.into(), &limit.origin),
        air: air(running, writer),
        air_connected: air(air_connected, writer),
    }
}

fn air<'a>(worked: &'a sizing::air::Air, writer: Writer) -> Air<'a> {
    let sizing::air::Air {
        surface,
        conductance,
        sealed_rise,
        sealed_inside,
        inside,
        pressure,
        density,
        airflow,
        airflow_credited,
        airflow_metric_rule,
        airflow_us_rule,
    } = worked;
    Air {
        surface: writer.maybe(surface.as_ref()),
        conductance: writer.maybe(conductance.as_ref()),
        sealed_rise: writer.maybe(sealed_rise.as_ref()),
        sealed_inside: writer.maybe(sealed_inside.as_ref()),
        inside: writer.given(inside.as_ref()),
        pressure: writer.maybe(pressure.as_ref()),
        density: writer.maybe(density.as_ref()),
        airflow: writer.maybe(airflow.as_ref()),
        airflow_credited: writer.maybe(airflow_credited.as_ref()),
        airflow_metric_rule: writer.maybe(airflow_metric_rule.as_ref()),
        airflow_us_rule: writer.maybe(airflow_us_rule.as_ref()),
    }
}
