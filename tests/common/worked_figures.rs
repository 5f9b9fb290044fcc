//! Every figure of a worked sheet, for tests which must see them all.
//!
//! Include it with `#[path = "common/worked_figures.rs"] mod worked_figures;`. The structs of a worked sheet are taken
//! apart field by field: one which gets a new field does not compile here until it is said whether figures are in it.

#![allow(
    dead_code,
    reason = "each test file that includes this one uses its own part of it"
)]

use std::collections::HashSet;
use std::sync::Arc;
use ventrail::sizing::air::Air;
use ventrail::sizing::conductor::{ConductorChoice, Conductors, Rejected};
use ventrail::sizing::device::Device;
use ventrail::sizing::fault::Fault;
use ventrail::sizing::heat::FeederHeat;
use ventrail::sizing::panel::{IncomingCircuit, MainDevice};
use ventrail::sizing::reactor::{Reactor, ReactorSize};
use ventrail::work::{
    Ledger, LedgerRow, Total, Worked, WorkedEnclosure, WorkedFeeder, WorkedSource,
};
use ventrail::working::{Figure, Given, MarginNote, Origin};

/// Every figure of the sheet and every figure below one, each once.
pub fn every_figure(worked: &Worked) -> Vec<Arc<Figure>> {
    with_all_below(figures_of(worked))
}

/// Every figure of one feeder and every figure below one, each once.
pub fn figures_of_feeder(feeder: &WorkedFeeder) -> Vec<Arc<Figure>> {
    let mut found = Found::default();
    found.feeder(feeder);
    with_all_below(found.0)
}

/// The figures and all below them, each once.
pub fn with_all_below(figures: Vec<Arc<Figure>>) -> Vec<Arc<Figure>> {
    let mut seen = HashSet::new();
    let mut waiting = figures;
    let mut found = Vec::new();
    while let Some(figure) = waiting.pop() {
        if !seen.insert(Arc::as_ptr(&figure)) {
            continue;
        }
        for term in &figure.terms {
            if let Origin::Figure(below) = &term.origin {
                waiting.push(Arc::clone(below));
            }
        }
        found.push(figure);
    }
    found
}

/// The figures which the sheet names itself.
fn figures_of(worked: &Worked) -> Vec<Arc<Figure>> {
    let mut found = Found::default();
    for feeder in &worked.feeders {
        found.feeder(feeder);
    }
    for source in &worked.sources {
        let WorkedSource {
            id: _,
            name: _,
            is_running: _,
            heat,
            current,
        } = source;
        found.given(heat);
        found.given(current);
    }
    found.incoming(&worked.incoming);
    found.fault(&worked.fault);
    found.ledger(&worked.ledger);
    found.enclosure(&worked.enclosure);
    for total in &worked.totals {
        let Total {
            kind: _,
            running: _,
            connected: _,
            figure,
            limit: _,
            verdict: _,
        } = total;
        found.figure(figure);
    }
    found.notes(&worked.notes);
    found.0
}

#[derive(Default)]
struct Found(Vec<Arc<Figure>>);

impl Found {
    fn figure(&mut self, figure: &Option<Arc<Figure>>) {
        self.0.extend(figure.clone());
    }

    fn given<T>(&mut self, given: &Option<Given<T>>) {
        if let Some(given) = given {
            self.origin(&given.origin);
        }
    }

    fn origin(&mut self, origin: &Origin) {
        if let Origin::Figure(figure) = origin {
            self.0.push(Arc::clone(figure));
        }
    }

    fn notes(&mut self, notes: &[MarginNote]) {
        self.0
            .extend(notes.iter().flat_map(|note| note.figures.clone()));
    }

    fn feeder(&mut self, feeder: &WorkedFeeder) {
        let WorkedFeeder {
            id: _,
            tag: _,
            load: _,
            is_running: _,
            motor_current,
            drive_input,
            ahead,
            behind,
            drop_ratio,
            device,
            disconnect,
            reactor,
            heat,
            short_circuit_rating,
            assumptions: _,
            notes,
        } = feeder;
        self.given(motor_current);
        self.given(drive_input);
        for conductors in [ahead, behind].into_iter().flatten() {
            self.conductors(conductors);
        }
        self.figure(drop_ratio);
        if let Some(device) = device {
            self.device(device);
        }
        self.figure(disconnect);
        self.reactor(reactor);
        self.heat(heat);
        self.given(short_circuit_rating);
        self.notes(notes);
    }

    fn conductors(&mut self, conductors: &Conductors) {
        let Conductors {
            input: _,
            required,
            choice,
            size,
            ampacity,
            drop,
            drop_ratio,
            grounding,
            heat,
        } = conductors;
        self.0.push(Arc::clone(required));
        if let ConductorChoice::Chosen {
            size: _,
            decided_by: _,
            smaller: Some(rejected),
        } = choice
        {
            let Rejected {
                size: _,
                fails: _,
                ampacity,
            } = rejected;
            self.figure(ampacity);
        }
        for figure in [size, ampacity, drop, drop_ratio, grounding, heat] {
            self.figure(figure);
        }
    }

    fn device(&mut self, device: &Device) {
        let Device {
            device: of_type,
            product,
            largest,
            rating,
        } = device;
        self.origin(&of_type.origin);
        self.0.push(Arc::clone(product));
        self.figure(largest);
        self.given(rating);
    }

    fn reactor(&mut self, reactor: &Reactor) {
        let Reactor {
            reasons: _,
            is_open: _,
            source_ratio,
            source_impedance,
            entered,
            advised,
        } = reactor;
        self.figure(source_ratio);
        self.figure(source_impedance);
        for size in [entered, advised].into_iter().flatten() {
            let ReactorSize {
                percent: _,
                reference,
                inductance,
                rated_current,
                heat,
            } = size;
            self.origin(&reference.origin);
            self.0.push(Arc::clone(inductance));
            self.0.push(Arc::clone(rated_current));
            self.given(heat);
        }
    }

    fn heat(&mut self, heat: &FeederHeat) {
        let FeederHeat {
            drive,
            drive_inside,
            reactor,
            device,
            conductors,
            total,
        } = heat;
        for given in [drive, reactor, device] {
            self.given(given);
        }
        for figure in [drive_inside, conductors, total] {
            self.figure(figure);
        }
    }

    fn incoming(&mut self, incoming: &IncomingCircuit) {
        let IncomingCircuit {
            running,
            connected,
            required_connected,
            conductors,
            main,
        } = incoming;
        for figure in [running, connected, required_connected] {
            self.figure(figure);
        }
        if let Some(conductors) = conductors {
            self.conductors(conductors);
        }
        if let Some(main) = main {
            let MainDevice {
                device,
                sum,
                sum_by_inputs,
                largest,
                rating,
            } = main;
            self.origin(&device.origin);
            self.0.push(Arc::clone(sum));
            self.0.push(Arc::clone(sum_by_inputs));
            self.figure(largest);
            self.given(rating);
        }
    }

    fn fault(&mut self, fault: &Fault) {
        let Fault {
            transformer_current,
            at_source,
            run_factor,
            multiplier,
            at_panel,
        } = fault;
        for figure in [transformer_current, run_factor, multiplier] {
            self.figure(figure);
        }
        for given in [at_source, at_panel] {
            self.given(given);
        }
    }

    fn ledger(&mut self, ledger: &Ledger) {
        let Ledger {
            rows,
            running,
            connected,
            advised_reactors,
        } = ledger;
        for row in rows {
            let LedgerRow {
                group: _,
                sources: _,
                running,
                connected,
            } = row;
            self.0.push(Arc::clone(running));
            self.0.push(Arc::clone(connected));
        }
        self.0.push(Arc::clone(running));
        self.0.push(Arc::clone(connected));
        self.figure(advised_reactors);
    }

    fn enclosure(&mut self, enclosure: &WorkedEnclosure) {
        let WorkedEnclosure {
            is_ventilated: _,
            ambient,
            limit,
            air,
            air_connected,
        } = enclosure;
        self.origin(&ambient.origin);
        self.origin(&limit.origin);
        self.air(air);
        self.air(air_connected);
    }

    fn air(&mut self, air: &Air) {
        let Air {
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
        } = air;
        for figure in [
            surface,
            conductance,
            sealed_rise,
            sealed_inside,
            pressure,
            density,
            airflow,
            airflow_credited,
            airflow_metric_rule,
            airflow_us_rule,
        ] {
            self.figure(figure);
        }
        self.given(inside);
    }
}
