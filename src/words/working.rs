//! The working of a figure in words: its rule, the numbers put into it, its source, and so on down to what was entered.

use super::entries::{amount_of_field_with_unit, assumption_reason};
use super::formulas::{mathematical, symbol_shown};
use super::labels::{known, label, lower_first};
use super::numbers::counted;
use super::rules::{rule_title, symbol_for};
use super::units::{amount, bare_in, unit_for_value, unit_of, with_unit};
use crate::quantity::{Kind, Unit};
use crate::sheet::UnitSystem;
use crate::working::{Amount, Figure, Form, Ink, Origin, Rule, Source, Term};
use std::sync::Arc;

/// One number put into a rule.
#[derive(Debug, Clone, PartialEq)]
pub struct TermLine {
    /// Its symbol as it is shown.
    pub symbol: String,
    /// What the symbol means; empty where the symbol says so itself.
    pub meaning: &'static str,
    /// The number with its unit.
    pub value: String,
    /// Its ink; `None` for a constant.
    pub ink: Option<Ink>,
    /// Where it came from.
    pub origin: String,
}

/// One step of a working.
#[derive(Debug, Clone, PartialEq)]
pub struct WorkingLine {
    /// What the figure is.
    pub title: String,
    /// The rule in symbols: `I_z = 1.25 × I_in`.
    pub formula: String,
    /// The numbers put into it and the result: `1.25 × 54 A = 67.5 A`.
    pub numbers: String,
    /// The result alone: `67.5 A`.
    pub result: String,
    /// The publication and the place in it: `NEC 2023, 430.122(A)`.
    pub source: String,
    /// What is to be said about how it is known; often empty.
    pub note: String,
    /// Worked, or assumed by a rule.
    pub ink: Ink,
    /// The numbers put in, one by one.
    pub terms: Vec<TermLine>,
}

/// Steps after which a chain is cut: a sum over hundreds of feeders is read at the feeders.
const MOST_LINES: usize = 120;
/// Parts of a sum which are written out.
const MOST_PARTS: usize = 60;

/// The value of a figure with its unit; shares in per cent.
pub fn figure(figure: &Figure, system: UnitSystem) -> String {
    match figure.value {
        Amount::Measured {
            si,
            kind: Kind::Ratio,
        } => {
            let unit = ratio_unit(figure.rule);
            with_unit(&bare_in(si, unit), unit)
        }
        value => amount(value, system),
    }
}

/// The chain of a figure: first the figure itself, then the figures put into it, depth first, none of them twice.
pub fn working(figure: &Figure, system: UnitSystem) -> Vec<WorkingLine> {
    let mut lines = Vec::new();
    collect(figure, system, &mut lines);
    lines
}

/// The first step of a working in one line, for print.
pub fn working_flat(figure: &Figure, system: UnitSystem) -> String {
    let line = working_line(figure, system);
    let joint = match figure.rule.form {
        Form::Formula { .. } => " =",
        Form::Sum | Form::Lookup | Form::Choice => ":",
    };
    let behind = if line.note.is_empty() {
        line.source
    } else {
        format!("{}; {}", line.source, line.note)
    };
    format!("{}{joint} {} ({behind})", line.formula, line.numbers)
}

/// One step of a working.
pub fn working_line(figure: &Figure, system: UnitSystem) -> WorkingLine {
    let rule = figure.rule;
    let result = self::figure(figure, system);
    let gives = symbol_shown(rule.gives);
    let (formula, numbers) = match rule.form {
        Form::Formula { expression, .. } => (
            format!("{gives} = {}", mathematical(expression, symbol_shown)),
            formula_numbers(figure, expression, system),
        ),
        Form::Sum => (
            format!("{gives} = sum of its parts"),
            sum_numbers(figure, &result, system),
        ),
        Form::Lookup => (
            format!("{gives}, looked up"),
            row_numbers(figure, &result, system),
        ),
        Form::Choice => (
            format!("{gives}, chosen"),
            row_numbers(figure, &result, system),
        ),
    };
    WorkingLine {
        title: rule_title(rule).to_owned(),
        formula,
        numbers,
        result,
        source: source_line(rule),
        note: note_on(figure),
        ink: figure.ink,
        terms: figure
            .terms
            .iter()
            .map(|term| term_line(term, &rule.form, system))
            .collect(),
    }
}

/// The publication of a rule and the place in it: `NEC 2023, 430.122(A)`.
pub fn source_line(rule: &Rule) -> String {
    format!("{}, {}", source_name(rule.source), rule.clause)
}

/// A publication by its short name, with its year where that is its edition.
pub fn source_name(source: &Source) -> String {
    let is_year =
        !source.edition.is_empty() && source.edition.bytes().all(|digit| digit.is_ascii_digit());
    if is_year {
        // Standards of the IEC carry their year behind a colon.
        let joint = if source.name.starts_with("IEC") {
            ":"
        } else {
            " "
        };
        format!("{}{joint}{}", source.name, source.edition)
    } else {
        source.name.to_owned()
    }
}

/// A publication in full, for the list of sources.
pub fn source_in_full(source: &Source) -> String {
    if source.edition.is_empty() {
        format!("{}: {}", source.name, source.title)
    } else {
        format!("{}, {}: {}", source.name, source.edition, source.title)
    }
}

fn collect(figure: &Figure, system: UnitSystem, lines: &mut Vec<WorkingLine>) {
    if lines.len() >= MOST_LINES {
        return;
    }
    let line = working_line(figure, system);
    if lines.contains(&line) {
        return;
    }
    lines.push(line);
    for term in &figure.terms {
        if let Origin::Figure(below) = &term.origin {
            collect(below, system, lines);
        }
    }
}

fn note_on(figure: &Figure) -> String {
    let known_how = known(figure.rule.known);
    match (figure.ink, known_how) {
        (Ink::Assumed, "") => "assumed until it is typed".to_owned(),
        (Ink::Assumed, known_how) => format!("assumed until it is typed; {known_how}"),
        (Ink::Entered | Ink::Worked, known_how) => known_how.to_owned(),
    }
}

fn term_line(term: &Term, form: &Form, system: UnitSystem) -> TermLine {
    let (ink, origin) = match &term.origin {
        Origin::Entered(field) => (
            Some(Ink::Entered),
            format!("entered: {}", lower_first(label(*field))),
        ),
        Origin::Assumed(field) => (
            Some(Ink::Assumed),
            format!(
                "assumed: {}, {}",
                lower_first(label(*field)),
                assumption_reason(*field)
            ),
        ),
        Origin::Constant => (
            None,
            match form {
                Form::Formula { .. } | Form::Sum => "given by the rule",
                Form::Lookup => "row or column of the table",
                Form::Choice => "for comparison",
            }
            .to_owned(),
        ),
        Origin::Figure(figure) => (Some(figure.ink), figure_origin(figure)),
    };
    let origin = match &term.whose {
        Some(whose) if !whose.is_empty() => format!("{whose}, {origin}"),
        _ => origin,
    };
    TermLine {
        symbol: symbol_shown(term.symbol),
        meaning: symbol_for(term.symbol, kind_of(term.amount)),
        value: term_value(term, system),
        ink,
        origin,
    }
}

fn figure_origin(figure: &Arc<Figure>) -> String {
    let title = lower_first(rule_title(figure.rule));
    match figure.ink {
        Ink::Assumed => format!("assumed: {title}"),
        Ink::Entered => format!("entered: {title}"),
        Ink::Worked => format!("worked: {title}"),
    }
}

const fn kind_of(amount: Amount) -> Option<Kind> {
    match amount {
        Amount::Measured { kind, .. } => Some(kind),
        Amount::Count(_) | Amount::Size(_) => None,
    }
}

/// A term as the person knows it: in the unit of its field where it has one.
fn term_value(term: &Term, system: UnitSystem) -> String {
    match (&term.origin, term.amount) {
        (Origin::Entered(field) | Origin::Assumed(field), value) => {
            amount_of_field_with_unit(*field, value, system)
        }
        (Origin::Figure(below), _) => figure(below, system),
        (Origin::Constant, Amount::Measured { si, kind }) => {
            let unit = match kind {
                // The columns of ampacity tables are named in degrees Celsius everywhere.
                Kind::Temperature if term.symbol == "column" => Unit::Celsius,
                Kind::Ratio => Unit::One,
                kind => unit_for_value(kind, si, system),
            };
            with_unit(&bare_in(si, unit), unit)
        }
        (Origin::Constant, value) => amount(value, system),
    }
}

/// The units of the numbers of one formula: those in which it can be followed with a pocket calculator.
struct FormulaUnits {
    system: UnitSystem,
    is_si_only: bool,
}

impl FormulaUnits {
    /// Formulas with heat flow, pressure or airflow in them hold in SI alone, by their constants or by their kinds.
    fn of(figure: &Figure, system: UnitSystem) -> Self {
        let is_si_only = figure
            .terms
            .iter()
            .map(|term| term.amount)
            .chain([figure.value])
            .filter_map(kind_of)
            .any(|kind| {
                matches!(
                    kind,
                    Kind::Transmittance
                        | Kind::HeatConductance
                        | Kind::SpecificHeat
                        | Kind::Density
                        | Kind::Pressure
                        | Kind::AirFlow
                )
            });
        Self {
            system: if is_si_only { UnitSystem::Si } else { system },
            is_si_only,
        }
    }

    fn shown(&self, value: Amount) -> String {
        match value {
            Amount::Measured { si, kind } => {
                let unit = self.unit(kind, si);
                with_unit(&bare_in(si, unit), unit)
            }
            other => amount(other, self.system),
        }
    }

    fn unit(&self, kind: Kind, si: f64) -> Unit {
        match kind {
            Kind::Ratio => Unit::One,
            Kind::ShaftPower => Unit::Watt,
            Kind::Pressure => Unit::Pascal,
            Kind::AirFlow => Unit::CubicMetrePerSecond,
            // The gas law needs the absolute temperature.
            Kind::Temperature if self.is_si_only => Unit::Kelvin,
            Kind::CrossSection => unit_for_value(kind, si, self.system),
            kind => unit_of(kind, self.system),
        }
    }
}

fn formula_numbers(figure: &Figure, expression: &str, system: UnitSystem) -> String {
    let units = FormulaUnits::of(figure, system);
    let put_in = mathematical(expression, |symbol| {
        figure
            .terms
            .iter()
            .find(|term| term.symbol == symbol)
            .map_or_else(|| symbol_shown(symbol), |term| units.shown(term.amount))
    });
    let plain = units.shown(figure.value);
    let result = self::figure(figure, system);
    if plain == result {
        format!("{put_in} = {result}")
    } else {
        format!("{put_in} = {plain} = {result}")
    }
}

fn sum_numbers(figure: &Figure, result: &str, system: UnitSystem) -> String {
    let part = |term: &Term| match term.amount {
        Amount::Measured {
            si,
            kind: Kind::Ratio,
        } => {
            let unit = ratio_unit(figure.rule);
            with_unit(&bare_in(si, unit), unit)
        }
        value => FormulaUnits::of(figure, system).shown(value),
    };
    let parts: Vec<String> = figure
        .terms
        .iter()
        .take(MOST_PARTS)
        .map(|term| match &term.whose {
            Some(whose) if !whose.is_empty() => format!("{whose} {}", part(term)),
            _ => part(term),
        })
        .collect();
    let left_out = figure.terms.len().saturating_sub(parts.len());
    match (parts.as_slice(), left_out) {
        ([], _) => format!("nothing to add: {result}"),
        (parts, 0) => format!("{} = {result}", parts.join(" + ")),
        (parts, left_out) => format!(
            "{} + … ({} more) = {result}",
            parts.join(" + "),
            counted(left_out)
        ),
    }
}

/// The numbers of a table row or of a choice, and what came of them.
fn row_numbers(figure: &Figure, result: &str, system: UnitSystem) -> String {
    if figure.terms.is_empty() {
        return result.to_owned();
    }
    let parts: Vec<String> = figure
        .terms
        .iter()
        .map(|term| format!("{} {}", symbol_shown(term.symbol), term_value(term, system)))
        .collect();
    format!("{}: {result}", parts.join(", "))
}

/// Shares are shown in per cent, factors as plain numbers.
fn ratio_unit(rule: &Rule) -> Unit {
    match rule.id {
        "sizing.drop.ratio"
        | "sizing.drop.both_runs"
        | "sizing.device.time_delay_percentage"
        | "sizing.device.nontime_delay_percentage"
        | "sizing.device.breaker_percentage"
        | "physics.circuit.impedance_on_base"
        | "physics.circuit.impedance_of_fault_current" => Unit::PerCent,
        _ => Unit::One,
    }
}
