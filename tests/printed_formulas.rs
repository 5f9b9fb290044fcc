//! What is printed is what is computed: every printed expression, evaluated, gives what its function gives, and every
//! figure of a worked sheet follows from the terms beside it.
//!
//! The evaluator of expressions is here alone, and knows nothing of the functions which it checks.

#![allow(
    clippy::expect_used,
    clippy::panic,
    clippy::indexing_slicing,
    reason = "a printed rule which is not as it should be is to be seen at once"
)]

#[path = "common/random_sheets.rs"]
mod random_sheets;
#[path = "common/worked_figures.rs"]
mod worked_figures;

use proptest::collection::vec;
use proptest::strategy::Strategy;
use proptest::test_runner::{Config, TestCaseError, TestRunner};
use random_sheets::{any_sheet, ordinary_sheet};
use std::collections::{BTreeMap, BTreeSet};
use std::fs;
use std::path::PathBuf;
use std::sync::Arc;
use ventrail::physics::{air, circuit, heat};
use ventrail::quantity::{
    ApparentPower, Area, Current, Density, Frequency, HeatConductance, ImpedancePerLength,
    Inductance, Length, LengthPerImpedance, Power, Pressure, Quantity, Ratio, ShaftPower,
    Temperature, TemperatureDifference, Transmittance, Unit, Voltage, WireSize,
};
use ventrail::sheet::{Entry, Measured, Sheet};
use ventrail::sizing::air::{AirInput, Walls, air_of};
use ventrail::sizing::conductor::{
    Conductors, Demand, RunInput, Surrounding, Terminal, demand_of, size_run,
};
use ventrail::sizing::device::{DeviceInput, disconnect, size_branch_device};
use ventrail::sizing::grounding::grounding_of;
use ventrail::sizing::panel::{FeederLoad, IncomingInput, incoming_circuit};
use ventrail::sizing::reactor::{ReactorInput, ReactorSupply, Reference, reactor_of};
use ventrail::sizing::rules;
use ventrail::tables::enclosure::Mounting;
use ventrail::tables::{Column, Conduit, DeviceType, Edition, Metal};
use ventrail::work::work_out;
use ventrail::working::{Amount, Field, Figure, Form, Given, Rule, Run};
use worked_figures::{every_figure, with_all_below};

/// The expression and the function do the same operations, at most in another order: they may differ by the rounding of
/// each, a few times 1.1e-16 of the value. The one power, of the atmosphere, is computed by two libraries.
const ROUNDING: f64 = 1e-12;

/// Random cases for each rule.
const CASES: u32 = 200;

#[test]
fn every_printed_formula_is_the_computed_one() {
    let mut failures = Vec::new();
    for rule in rules::all() {
        if !matches!(rule.form, Form::Formula { .. }) {
            continue;
        }
        let verdict = match proof_of(rule.id) {
            Some(proof) => proof.run(rule),
            None => Err("no function is compared with it".to_owned()),
        };
        if let Err(reason) = verdict {
            failures.push(format!("{}: {reason}", rule.id));
        }
    }
    assert!(failures.is_empty(), "\n{}\n", failures.join("\n"));
}

#[test]
fn every_expression_uses_its_symbols_and_no_other_names() {
    for rule in rules::all() {
        let Form::Formula {
            expression,
            symbols,
        } = rule.form
        else {
            continue;
        };
        let named: BTreeSet<&str> = names_in(expression);
        let declared: BTreeSet<&str> = symbols.iter().copied().collect();
        assert_eq!(named, declared, "{}", rule.id);
        assert_eq!(declared.len(), symbols.len(), "{} names one twice", rule.id);
    }
}

#[test]
fn every_figure_of_a_random_sheet_follows_from_its_terms() {
    let mut seen = BTreeSet::new();
    let fed_by_a_fault_current = ordinary_sheet().prop_map(fed_by_a_fault_current);
    for sort in [
        ordinary_sheet().boxed(),
        any_sheet().boxed(),
        fed_by_a_fault_current.boxed(),
    ] {
        let mut runner = runner(60);
        let checked = std::cell::RefCell::new(BTreeSet::new());
        let verdict = runner.run(&sort, |sheet| {
            for figure in every_figure(&work_out(&sheet)) {
                follows_from_its_terms(&figure).map_err(TestCaseError::fail)?;
                checked.borrow_mut().insert(figure.rule.id);
            }
            Ok(())
        });
        if let Err(failure) = verdict {
            panic!("{failure}");
        }
        seen.extend(checked.into_inner());
    }
    let unseen: Vec<&str> = rules::all()
        .iter()
        .filter(|rule| matches!(rule.form, Form::Formula { .. } | Form::Sum))
        .map(|rule| rule.id)
        .filter(|id| !seen.contains(id))
        .collect();
    assert!(
        unseen.is_empty(),
        "no random sheet has a figure by {unseen:?}"
    );
}

/// The sheet with a fault current in place of its transformer: rare by chance, and with a rule of its own.
fn fed_by_a_fault_current(mut sheet: Sheet) -> Sheet {
    sheet.record.clear(Field::TransformerPower);
    for (field, number, unit) in [
        (Field::SupplyVoltage, 480.0, Unit::Volt),
        (Field::SourceFaultCurrent, 20.0, Unit::Kiloampere),
    ] {
        let measured = Measured {
            number,
            unit,
            text: number.to_string(),
        };
        let entry = Entry::Measured(measured);
        sheet.record.set(field, entry).expect("an entry which fits");
    }
    sheet
}

#[test]
fn every_figure_of_an_example_follows_from_its_terms() {
    let folder = PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("examples");
    let mut examples = 0;
    for entry in fs::read_dir(&folder).expect("the folder of the examples") {
        let path = entry.expect("an entry of the folder").path();
        if path.extension().is_none_or(|extension| extension != "json") {
            continue;
        }
        examples += 1;
        let text = fs::read_to_string(&path).expect("a readable example");
        let document = ventrail::file::read(&text).expect("an example opens");
        let figures = every_figure(&work_out(&document.sheet));
        assert!(figures.len() > 50, "{} works out to little", path.display());
        for figure in figures {
            if let Err(reason) = follows_from_its_terms(&figure) {
                panic!("{}: {reason}", path.display());
            }
        }
    }
    assert!(examples > 0, "{} has no examples", folder.display());
}

/// A formula's value follows from its terms, which stand in the order of its symbols; a sum's value is that of its terms.
fn follows_from_its_terms(figure: &Figure) -> Result<(), String> {
    let told = |what: String| Err(format!("{}: {what}\n{figure:?}", figure.rule.id));
    match figure.rule.form {
        Form::Formula {
            expression,
            symbols,
        } => {
            let recorded: Vec<&str> = figure.terms.iter().map(|term| term.symbol).collect();
            if recorded != symbols {
                return told(format!("terms {recorded:?}, symbols {symbols:?}"));
            }
            let value = number_of(figure.value)?;
            let given = figure
                .terms
                .iter()
                .map(|term| Ok((term.symbol, number_of(term.amount)?)))
                .collect::<Result<BTreeMap<_, _>, String>>()?;
            let evaluated = evaluate(expression, &given)?;
            if is_close(value, evaluated) {
                Ok(())
            } else {
                told(format!("shows {value}, its terms give {evaluated}"))
            }
        }
        Form::Sum => {
            let Amount::Measured { si, kind } = figure.value else {
                return told("a sum which is no quantity".to_owned());
            };
            let mut sum = 0.0;
            for term in &figure.terms {
                match term.amount {
                    Amount::Measured { si, kind: its } if its == kind => sum += si,
                    other => return told(format!("{other:?} in a sum of {kind:?}")),
                }
            }
            if is_close(si, sum) {
                Ok(())
            } else {
                told(format!("shows {si}, its terms give {sum}"))
            }
        }
        Form::Lookup | Form::Choice => Ok(()),
    }
}

fn number_of(amount: Amount) -> Result<f64, String> {
    match amount {
        Amount::Measured { si, .. } => Ok(si),
        Amount::Count(count) => Ok(f64::from(count)),
        Amount::Size(size) => Err(format!("{size:?} stands where a number should")),
    }
}

fn is_close(a: f64, b: f64) -> bool {
    (a - b).abs() <= ROUNDING * a.abs().max(b.abs())
}

fn runner(cases: u32) -> TestRunner {
    TestRunner::new(Config {
        cases,
        failure_persistence: None,
        ..Config::default()
    })
}

// --- each formula and the function which computes it ----------------------------------------------------------------

/// How a printed formula is held against the code.
enum Proof {
    /// A function of the terms alone, with the range of each.
    Of(&'static [(f64, f64)], fn(&[f64]) -> f64),
    /// A function of `sizing`, which gives figures: among them one by the rule, whose terms are then evaluated.
    Through(fn(&mut Draw) -> Vec<Arc<Figure>>),
}

impl Proof {
    fn run(&self, rule: &'static Rule) -> Result<(), String> {
        let Form::Formula {
            expression,
            symbols,
        } = rule.form
        else {
            return Err("no formula".to_owned());
        };
        let units = vec(0.0..=1.0_f64, 40);
        runner(CASES)
            .run(&units, |units| {
                let mut draw = Draw { units, at: 0 };
                match self {
                    Proof::Of(ranges, computed) => {
                        if ranges.len() != symbols.len() {
                            return Err(TestCaseError::fail("a range for each symbol is missing"));
                        }
                        let terms: Vec<f64> = ranges
                            .iter()
                            .map(|(least, most)| draw.between(*least, *most))
                            .collect();
                        let terms = as_they_belong(symbols, terms);
                        let given = symbols.iter().copied().zip(terms.iter().copied()).collect();
                        let evaluated =
                            evaluate(expression, &given).map_err(TestCaseError::fail)?;
                        let got = computed(&terms);
                        if is_close(evaluated, got) {
                            Ok(())
                        } else {
                            Err(TestCaseError::fail(format!(
                                "{given:?}: printed {evaluated}, computed {got}"
                            )))
                        }
                    }
                    Proof::Through(figures) => {
                        let all = with_all_below(figures(&mut draw));
                        let mut by_rule = 0;
                        for figure in all.iter().filter(|figure| figure.rule.id == rule.id) {
                            follows_from_its_terms(figure).map_err(TestCaseError::fail)?;
                            by_rule += 1;
                        }
                        if by_rule == 0 {
                            return Err(TestCaseError::fail("the function gave no such figure"));
                        }
                        Ok(())
                    }
                }
            })
            .map_err(|failure| failure.to_string())
    }
}

/// The sine belongs to its cosine and cannot be drawn apart; a number of conductors or paths is whole.
fn as_they_belong(symbols: &[&str], mut terms: Vec<f64>) -> Vec<f64> {
    let position = |name: &str| symbols.iter().position(|symbol| *symbol == name);
    if let (Some(cosphi), Some(sinphi)) = (position("cosphi"), position("sinphi")) {
        terms[sinphi] = (1.0 - terms[cosphi] * terms[cosphi]).sqrt();
    }
    if let Some(count) = position("n") {
        terms[count] = terms[count].floor();
    }
    terms
}

/// A whole number as the functions take it.
fn whole(number: f64) -> u32 {
    (0..100)
        .find(|count| f64::from(*count) >= number)
        .expect("a small number")
}

/// Random numbers, one after the other.
struct Draw {
    units: Vec<f64>,
    at: usize,
}

impl Draw {
    fn unit(&mut self) -> f64 {
        let unit = self.units.get(self.at).copied().unwrap_or(0.5);
        self.at += 1;
        unit
    }

    fn between(&mut self, least: f64, most: f64) -> f64 {
        least + (most - least) * self.unit()
    }

    fn one_of<T: Copy>(&mut self, items: &[T]) -> T {
        let share = self.unit();
        let count = f64::from(u32::try_from(items.len()).expect("a short list"));
        let mut at = 0;
        while at + 1 < items.len()
            && share * count >= f64::from(u32::try_from(at).expect("short")) + 1.0
        {
            at += 1;
        }
        items[at]
    }

    fn given<Q: Quantity>(&mut self, field: Field, least: f64, most: f64) -> Given<Q> {
        Given::entered(field, Q::from_si(self.between(least, most)))
    }
}

const CURRENT: (f64, f64) = (0.1, 3_000.0);
const VOLTAGE: (f64, f64) = (100.0, 1_000.0);
const POWER: (f64, f64) = (0.0, 50_000.0);
const SOURCE_POWER: (f64, f64) = (1e4, 5e6);
const SHARE: (f64, f64) = (0.0, 1.0);
const EFFICIENCY: (f64, f64) = (0.3, 1.0);
const LENGTH: (f64, f64) = (0.05, 2_000.0);
const MEASURE: (f64, f64) = (0.05, 5.0);
const COUNT: (f64, f64) = (1.0, 12.99);
const RISE: (f64, f64) = (0.1, 60.0);
const KELVIN: (f64, f64) = (233.15, 363.15);
const IMPEDANCE: (f64, f64) = (1e-5, 1e-2);

/// How the formula of a rule is proven; `None` for a rule which nothing computes.
#[rustfmt::skip]
fn proof_of(id: &str) -> Option<Proof> {
    use Proof::{Of, Through};
    Some(match id {
        "sizing.drive.input_assumed" => Of(&[(10.0, 1e6), EFFICIENCY, EFFICIENCY, VOLTAGE, (0.2, 1.0)], |t| {
            circuit::drive_input_current(
                ShaftPower::from_si(t[0]), Voltage::from_si(t[3]), Ratio::from_si(t[1]), Ratio::from_si(t[2]), Ratio::from_si(t[4]),
            ).si()
        }),
        "sizing.conductor.input_ampacity" => Of(&[CURRENT], |t| demanded(&rules::INPUT_AMPACITY, "I_in", t[0])),
        "sizing.conductor.output_ampacity" => Of(&[CURRENT], |t| demanded(&rules::OUTPUT_AMPACITY, "I_m", t[0])),
        "sizing.conductor.terminal_ampacity" | "sizing.conductor.corrected_ampacity" | "sizing.drop.ratio" => {
            Through(|draw| figures_of_run(&sized_run(draw)))
        }
        "physics.circuit.reactive_factor" => Of(&[SHARE], |t| circuit::reactive_factor(Ratio::from_si(t[0])).si()),
        "physics.circuit.voltage_drop" => {
            Of(&[CURRENT, IMPEDANCE, SHARE, IMPEDANCE, SHARE, LENGTH, COUNT], |t| {
                circuit::voltage_drop(
                    Current::from_si(t[0]), Ratio::from_si(t[2]),
                    circuit::DropRun {
                        resistance: ImpedancePerLength::from_si(t[1]), reactance: ImpedancePerLength::from_si(t[3]),
                        length: Length::from_si(t[5]), sets: whole(t[6]),
                    },
                ).si()
            })
        }
        "physics.heat.run_loss" => Of(&[CURRENT, IMPEDANCE, LENGTH, COUNT], |t| {
            heat::run_loss(Current::from_si(t[0]), ImpedancePerLength::from_si(t[1]), Length::from_si(t[2]), whole(t[3])).si()
        }),
        "sizing.device.product" => Through(|draw| {
            let input = device_input(draw);
            vec![size_branch_device(&input, EDITION, &mut Vec::new()).product]
        }),
        "sizing.device.disconnect" => Of(&[CURRENT], |t| {
            si_of(&disconnect(&Given::entered(Field::DriveInput, Current::from_si(t[0]))))
        }),
        "sizing.grounding.ratio" | "sizing.grounding.grown_area" => Through(|draw| {
            let conductors = sized_run(draw);
            let rating = draw.given(Field::DeviceRating, 15.0, 6_000.0);
            grounding_of(&conductors, &rating, &mut Vec::new()).into_iter().collect()
        }),
        "physics.circuit.apparent_power" => Of(&[VOLTAGE, CURRENT], |t| {
            circuit::apparent_power(Voltage::from_si(t[0]), Current::from_si(t[1])).si()
        }),
        "sizing.reactor.source_ratio" => Through(reactor_figures),
        "physics.circuit.impedance_of_fault_current" => Of(&[SOURCE_POWER, (200.0, 600.0), (1e3, 1e5)], |t| {
            circuit::impedance_of_fault_current(ApparentPower::from_si(t[0]), Voltage::from_si(t[1]), Current::from_si(t[2])).si()
        }),
        "physics.circuit.impedance_on_base" => Of(&[(0.005, 0.2), SOURCE_POWER, SOURCE_POWER], |t| {
            circuit::impedance_on_base(Ratio::from_si(t[0]), ApparentPower::from_si(t[2]), ApparentPower::from_si(t[1])).si()
        }),
        "physics.circuit.reactor_inductance" => Of(&[(0.001, 0.15), VOLTAGE, (40.0, 70.0), CURRENT], |t| {
            let inductance: Inductance = circuit::reactor_inductance(
                Ratio::from_si(t[0]), Voltage::from_si(t[1]), Frequency::from_si(t[2]), Current::from_si(t[3]),
            );
            inductance.si()
        }),
        "physics.heat.reactor_loss_by_motor" => Of(&[SHARE, POWER], |t| {
            heat::reactor_loss_by_motor(Ratio::from_si(t[0]), ShaftPower::from_si(t[1])).si()
        }),
        "physics.circuit.transformer_current" => Of(&[SOURCE_POWER, VOLTAGE], |t| {
            circuit::transformer_current(ApparentPower::from_si(t[0]), Voltage::from_si(t[1])).si()
        }),
        "physics.circuit.transformer_fault" => Of(&[CURRENT, (0.005, 0.2), (0.5, 1.0)], |t| {
            circuit::transformer_fault_current(Current::from_si(t[0]), Ratio::from_si(t[1]), Ratio::from_si(t[2])).si()
        }),
        "physics.circuit.run_factor" => Of(&[LENGTH, (100.0, 2e5), (50.0, 2e4), COUNT, VOLTAGE], |t| {
            circuit::run_factor(
                Current::from_si(t[1]), Voltage::from_si(t[4]),
                circuit::FaultRun { constant: LengthPerImpedance::from_si(t[2]), length: Length::from_si(t[0]), sets: whole(t[3]) },
            ).si()
        }),
        "physics.circuit.run_multiplier" => Of(&[(0.0, 50.0)], |t| circuit::run_multiplier(Ratio::from_si(t[0])).si()),
        "sizing.fault.at_panel" => Of(&[SHARE, (100.0, 2e5)], |t| {
            circuit::share_of(Ratio::from_si(t[0]), Current::from_si(t[1])).si()
        }),
        "sizing.panel.incoming_ampacity" | "sizing.panel.main_sum" => Through(incoming_figures),
        "physics.heat.drive_loss_by_motor" => Of(&[SHARE, POWER, POWER], |t| {
            heat::drive_loss_by_motor(Ratio::from_si(t[0]), ShaftPower::from_si(t[1]), Power::from_si(t[2])).si()
        }),
        "physics.heat.kept_inside" => Of(&[POWER, SHARE], |t| {
            heat::kept_inside(Power::from_si(t[0]), Ratio::from_si(t[1])).si()
        }),
        "physics.heat.loss_by_square_of_current" => Of(&[COUNT, POWER, CURRENT, CURRENT], |t| {
            heat::loss_by_square_of_current(whole(t[0]), Power::from_si(t[1]), Current::from_si(t[3]), Current::from_si(t[2])).si()
        }),
        "physics.heat.supply_loss" => Of(&[POWER, EFFICIENCY], |t| {
            heat::supply_loss(Power::from_si(t[0]), Ratio::from_si(t[1])).si()
        }),
        "physics.heat.effective_surface" => Of(&[SHARE, MEASURE, MEASURE, SHARE, SHARE, MEASURE, (0.0, 2.0)], |t| {
            heat::effective_surface(
                heat::Measures { height: Length::from_si(t[5]), width: Length::from_si(t[1]), depth: Length::from_si(t[2]) },
                heat::FaceWeights {
                    top: Ratio::from_si(t[0]), front: Ratio::from_si(t[3]), rear: Ratio::from_si(t[4]), sides: Ratio::from_si(t[6]),
                },
            ).si()
        }),
        "physics.heat.wall_conductance" => Of(&[(0.1, 30.0), (0.01, 100.0)], |t| {
            heat::wall_conductance(Transmittance::from_si(t[0]), Area::from_si(t[1])).si()
        }),
        "physics.heat.sealed_rise" => Of(&[POWER, (0.01, 1_000.0)], |t| {
            heat::sealed_rise(Power::from_si(t[0]), HeatConductance::from_si(t[1])).si()
        }),
        "physics.heat.sealed_inside" | "physics.air.permitted_rise" => Through(air_figures),
        "physics.air.site_pressure" => Of(&[(-430.0, 5_000.0)], |t| air::site_pressure(Length::from_si(t[0])).si()),
        "physics.air.density" => Of(&[(5e4, 1.1e5), KELVIN], |t| {
            air::dry_air_density(Pressure::from_si(t[0]), Temperature::from_si(t[1])).si()
        }),
        "physics.air.airflow" => Of(&[POWER, (0.5, 1.5), (1006.0, 1006.0), RISE], |t| {
            air::airflow(Power::from_si(t[0]), Density::from_si(t[1]), TemperatureDifference::from_si(t[3])).si()
        }),
        "physics.air.metric_rule" => Of(&[POWER, RISE], |t| {
            air::airflow_by_metric_rule(Power::from_si(t[0]), TemperatureDifference::from_si(t[1])).si()
        }),
        "physics.air.us_rule" => Of(&[POWER, RISE], |t| {
            air::airflow_by_us_rule(Power::from_si(t[0]), TemperatureDifference::from_si(t[1])).si()
        }),
        _ => return None,
    })
}

const EDITION: Edition = Edition::Nec2023;

fn si_of(figure: &Figure) -> f64 {
    match figure.value {
        Amount::Measured { si, .. } => si,
        other => panic!("{other:?} is no quantity"),
    }
}

fn demanded(rule: &'static Rule, symbol: &'static str, amperes: f64) -> f64 {
    let current = Given::entered(Field::DriveInput, Current::amperes(amperes));
    si_of(&demand_of(rule, symbol, &current).ampacity)
}

/// A run in the field, warm and shared so that both columns are worked, with an installed size above the smallest which
/// fits, so that its grounding conductor grows.
fn sized_run(draw: &mut Draw) -> Conductors {
    let current = draw.given(Field::DriveInput, 1.0, 120.0);
    let demand: Demand = demand_of(&rules::INPUT_AMPACITY, "I_in", &current);
    let voltage = draw.given(Field::SupplyVoltage, 200.0, 600.0);
    let input = RunInput {
        run: Run::Ahead,
        surrounding: Surrounding::Field {
            ambient: draw.given(Field::RoomAmbient, 273.15, 313.15),
            carrying: Given::entered(Field::Tag, draw.one_of(&[1, 3, 4, 6, 9, 12])),
        },
        metal: Given::entered(Field::Tag, draw.one_of(&[Metal::Copper, Metal::Aluminium])),
        sets: Given::entered(Field::Tag, draw.one_of(&[1, 2, 3, 4])),
        size: Some(WireSize::Kcmil1000),
        insulation: Given::entered(Field::Tag, draw.one_of(&[Column::C75, Column::C90])),
        terminal: Given::entered(
            Field::Tag,
            draw.one_of(&[Terminal::Unmarked, Terminal::Marked60, Terminal::Marked75]),
        ),
        conduit: Given::entered(
            Field::Tag,
            draw.one_of(&[Conduit::Steel, Conduit::Pvc, Conduit::Aluminium]),
        ),
        length: Some(draw.given(Field::Altitude, 1.0, 300.0)),
        power_factor: draw.given(Field::HeatsinkShare, 0.1, 1.0),
    };
    size_run(&input, &demand, &voltage, &mut Vec::new()).expect("a demand in amperes")
}

fn figures_of_run(conductors: &Conductors) -> Vec<Arc<Figure>> {
    [
        &conductors.size,
        &conductors.ampacity,
        &conductors.drop_ratio,
    ]
    .into_iter()
    .flatten()
    .cloned()
    .collect()
}

fn device_input(draw: &mut Draw) -> DeviceInput {
    DeviceInput {
        device: Given::entered(
            Field::DeviceType,
            draw.one_of(&[
                DeviceType::TimeDelayFuse,
                DeviceType::NontimeDelayFuse,
                DeviceType::InverseTimeBreaker,
            ]),
        ),
        motor_current: draw.given(Field::MotorCurrent, 0.5, 500.0),
        drive_input: Some(draw.given(Field::DriveInput, 0.5, 500.0)),
        permitted: None,
        largest: None,
        rating: None,
    }
}

fn reactor_figures(draw: &mut Draw) -> Vec<Arc<Figure>> {
    let supply = ReactorSupply {
        voltage: draw.given(Field::SupplyVoltage, 200.0, 600.0),
        frequency: draw.given(Field::SupplyFrequency, 50.0, 60.0),
        power: Some(draw.given(Field::TransformerPower, 1e4, 5e6)),
        impedance: draw.given(Field::TransformerImpedance, 0.01, 0.1),
        fault: None,
        unbalance: draw.given(Field::VoltageUnbalance, 0.0, 0.05),
        has_capacitors: false,
        has_surges: false,
    };
    let input = ReactorInput {
        drive_input: draw.given(Field::DriveInput, 1.0, 500.0),
        motor_current: None,
        motor_power: None,
        choke: draw.given(Field::DriveChoke, 0.0, 0.05),
        percent: None,
        reference: Reference::DriveInput,
        own_reference: None,
        loss: None,
    };
    reactor_of(&input, &supply, &mut Vec::new())
        .source_ratio
        .into_iter()
        .collect()
}

fn incoming_figures(draw: &mut Draw) -> Vec<Arc<Figure>> {
    let feeders = (0..draw.one_of(&[1, 2, 3]))
        .map(|_| {
            let branch = device_input(draw);
            FeederLoad {
                tag: "F".into(),
                is_running: true,
                drive_input: branch.drive_input.clone().expect("it was drawn"),
                branch: Some(branch),
            }
        })
        .collect();
    let conductors = sized_run(draw);
    let input = IncomingInput {
        feeders,
        others: Vec::new(),
        run: conductors.input,
        voltage: draw.given(Field::SupplyVoltage, 200.0, 600.0),
        main: Given::entered(Field::MainType, DeviceType::InverseTimeBreaker),
        main_rating: None,
        edition: EDITION,
    };
    let incoming = incoming_circuit(&input, &mut Vec::new());
    incoming
        .conductors
        .map(|conductors| conductors.required)
        .into_iter()
        .chain(incoming.main.map(|main| main.sum))
        .collect()
}

fn air_figures(draw: &mut Draw) -> Vec<Arc<Figure>> {
    let heat: Power = Power::from_si(draw.between(1.0, 5_000.0));
    let input = AirInput {
        walls: Some(Walls {
            height: draw.given(Field::EnclosureHeight, 0.3, 3.0),
            width: draw.given(Field::EnclosureWidth, 0.3, 3.0),
            depth: draw.given(Field::EnclosureDepth, 0.2, 1.0),
            mounting: draw.one_of(&Mounting::ALL),
            coefficient: draw.given(Field::WallCoefficient, 1.0, 10.0),
        }),
        heat: Arc::new(
            rules::LEDGER_SUM.figure(heat, [Given::entered(Field::SourceHeat, heat).term("P")]),
        ),
        ambient: draw.given(Field::RoomAmbient, 273.15, 313.15),
        limit: draw.given(Field::InsideLimit, 318.15, 333.15),
        altitude: draw.given(Field::Altitude, 0.0, 3_000.0),
        is_ventilated: false,
    };
    let air = air_of(&input);
    air.sealed_inside.into_iter().chain(air.airflow).collect()
}

// --- the evaluator --------------------------------------------------------------------------------------------------

/// The value of an expression in plain ASCII: `+ - * / ^`, parentheses, `sqrt`, `pi`, numbers and names.
fn evaluate(expression: &str, given: &BTreeMap<&str, f64>) -> Result<f64, String> {
    let mut reader = Expression {
        rest: expression,
        given,
    };
    let value = reader.sum()?;
    if reader.peek().is_some() {
        return Err(format!(
            "{expression:?}: nothing may follow {:?}",
            reader.rest
        ));
    }
    Ok(value)
}

fn names_in(expression: &str) -> BTreeSet<&str> {
    expression
        .split(|character: char| !(character.is_ascii_alphanumeric() || character == '_'))
        .filter(|name| name.starts_with(|first: char| first.is_ascii_alphabetic()))
        .filter(|name| !matches!(*name, "sqrt" | "pi"))
        .collect()
}

struct Expression<'a> {
    rest: &'a str,
    given: &'a BTreeMap<&'a str, f64>,
}

impl<'a> Expression<'a> {
    fn peek(&mut self) -> Option<char> {
        self.rest = self.rest.trim_start_matches(' ');
        self.rest.chars().next()
    }

    fn take(&mut self, wanted: char) -> bool {
        let is_next = self.peek() == Some(wanted);
        if is_next {
            self.rest = &self.rest[wanted.len_utf8()..];
        }
        is_next
    }

    fn take_while(&mut self, wanted: impl Fn(char) -> bool) -> &'a str {
        let end = self
            .rest
            .find(|character| !wanted(character))
            .unwrap_or(self.rest.len());
        let (taken, rest) = self.rest.split_at(end);
        self.rest = rest;
        taken
    }

    fn sum(&mut self) -> Result<f64, String> {
        let mut value = self.product()?;
        loop {
            if self.take('+') {
                value += self.product()?;
            } else if self.take('-') {
                value -= self.product()?;
            } else {
                return Ok(value);
            }
        }
    }

    fn product(&mut self) -> Result<f64, String> {
        let mut value = self.raised()?;
        loop {
            if self.take('*') {
                value *= self.raised()?;
            } else if self.take('/') {
                value /= self.raised()?;
            } else {
                return Ok(value);
            }
        }
    }

    /// A power binds closer than a product, and to the right.
    #[allow(
        clippy::disallowed_methods,
        reason = "the evaluator must not share its arithmetic with the room `math` which it checks"
    )]
    fn raised(&mut self) -> Result<f64, String> {
        let base = self.atom()?;
        if self.take('^') {
            return Ok(base.powf(self.raised()?));
        }
        Ok(base)
    }

    fn atom(&mut self) -> Result<f64, String> {
        match self.peek() {
            Some('(') => {
                self.take('(');
                let value = self.sum()?;
                if self.take(')') {
                    Ok(value)
                } else {
                    Err(format!(
                        "a parenthesis is not closed before {:?}",
                        self.rest
                    ))
                }
            }
            Some(first) if first.is_ascii_digit() => {
                let digits =
                    self.take_while(|character| character.is_ascii_digit() || character == '.');
                digits
                    .parse()
                    .map_err(|_| format!("{digits:?} is no number"))
            }
            Some(first) if first.is_ascii_alphabetic() => {
                let name = self
                    .take_while(|character| character.is_ascii_alphanumeric() || character == '_');
                match name {
                    "pi" => Ok(std::f64::consts::PI),
                    "sqrt" => {
                        if self.peek() == Some('(') {
                            Ok(self.atom()?.sqrt())
                        } else {
                            Err("`sqrt` wants a parenthesis".to_owned())
                        }
                    }
                    _ => self
                        .given
                        .get(name)
                        .copied()
                        .ok_or_else(|| format!("{name:?} is not given")),
                }
            }
            Some(other) => Err(format!("{other:?} begins nothing")),
            None => Err("something is missing at the end".to_owned()),
        }
    }
}

#[test]
fn expressions_are_evaluated_as_they_are_read() {
    let given = BTreeMap::from([("a", 3.0), ("b_1", 4.0)]);
    for (expression, expected) in [
        ("1 + 2 * a", 7.0),
        ("(1 + 2) * a", 9.0),
        ("10 - 4 - a", 3.0),
        ("24 / 4 / a", 2.0),
        ("24 / (4 * a)", 2.0),
        ("2 * a ^ 2", 18.0),
        ("2 ^ a ^ 2", 512.0),
        ("sqrt(a * a + b_1 * b_1)", 5.0),
        ("sqrt(b_1) * 2.5", 5.0),
        ("2*pi", std::f64::consts::TAU),
    ] {
        let value = evaluate(expression, &given);
        assert!(
            value.as_ref().is_ok_and(|value| is_close(*value, expected)),
            "{expression}: {value:?}"
        );
    }
    for refused in [
        "", "1 +", "(1", "1)", "c", "1 2", "sqrt a", "1 ** 2", "1.2.3", "-1",
    ] {
        assert!(evaluate(refused, &given).is_err(), "{refused}");
    }
    assert_eq!(
        names_in("sqrt(3) * I * 1e / b_1 - pi"),
        BTreeSet::from(["I", "b_1"])
    );
}

/// The check of figures itself: one with a wrong value, a term too few or terms in the wrong order is found.
#[test]
fn a_figure_which_does_not_follow_from_its_terms_is_found() {
    let current = |amperes| Given::entered(Field::DriveInput, Current::amperes(amperes));
    let figure = |value: f64, terms: &[(&'static str, f64)]| {
        let terms: Vec<_> = terms
            .iter()
            .map(|(symbol, amperes)| current(*amperes).term(symbol))
            .collect();
        rules::INCOMING_AMPACITY.figure(Current::amperes(value), terms)
    };
    assert!(follows_from_its_terms(&figure(35.0, &[("I_1", 20.0), ("I_o", 10.0)])).is_ok());
    for wrong in [
        figure(35.000_001, &[("I_1", 20.0), ("I_o", 10.0)]),
        figure(25.0, &[("I_1", 20.0)]),
        figure(35.0, &[("I_o", 10.0), ("I_1", 20.0)]),
    ] {
        assert!(follows_from_its_terms(&wrong).is_err(), "{wrong:?}");
    }
    let sum = |value: f64| {
        rules::RUNNING_CURRENT.figure(
            Current::amperes(value),
            vec![current(1.0).term("I"), current(2.0).term("I")],
        )
    };
    assert!(follows_from_its_terms(&sum(3.0)).is_ok());
    assert!(follows_from_its_terms(&sum(4.0)).is_err());
    let mixed = rules::RUNNING_CURRENT.figure(
        Current::amperes(1.0),
        vec![
            current(1.0).term("I"),
            Given::entered(Field::SourceHeat, Power::watts(0.0)).term("P"),
        ],
    );
    assert!(follows_from_its_terms(&mixed).is_err());
}
