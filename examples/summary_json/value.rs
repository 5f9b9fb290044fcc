//! One value with its unit, its ink and its working.

use serde::{Serialize, Serializer};
use std::sync::Arc;
use ventrail::assume::AssumedValue;
use ventrail::file::{choice_name, field_name, size_name};
use ventrail::quantity::{Kind, Quantity};
use ventrail::sheet::UnitSystem;
use ventrail::words;
use ventrail::working::{
    Amount, Field, Figure, Form, Given, Ink, Known, Origin, Rule, Source, Term,
};

#[derive(Serialize)]
pub struct Value<'a> {
    value: Number,
    #[serde(skip_serializing_if = "Option::is_none")]
    unit: Option<&'static str>,
    shown: String,
    #[serde(skip_serializing_if = "Option::is_none")]
    ink: Option<&'static str>,
    #[serde(skip_serializing_if = "Option::is_none")]
    field: Option<String>,
    #[serde(skip_serializing_if = "Option::is_none")]
    working: Option<Working<'a>>,
}

#[derive(Serialize)]
#[serde(untagged)]
enum Number {
    Measured(f64),
    Count(u32),
    Name(&'static str),
}

#[derive(Serialize)]
struct Working<'a> {
    rule: &'static str,
    title: &'static str,
    gives: &'static str,
    form: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    expression: Option<&'static str>,
    source: SourceName,
    clause: &'static str,
    known: &'static str,
    terms: Terms<'a>,
}

#[derive(Serialize)]
struct SourceName {
    name: &'static str,
    edition: &'static str,
    title: &'static str,
}

#[derive(Serialize)]
struct TermLine<'a> {
    symbol: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    whose: Option<&'a str>,
    #[serde(flatten)]
    value: Value<'a>,
}

/// The terms of a working, made one by one while they are written: a large sheet has too many to hold them all.
struct Terms<'a> {
    terms: &'a [Term],
    writer: Writer,
}

impl Serialize for Terms<'_> {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        serializer.collect_seq(self.terms.iter().map(|term| self.writer.term(term)))
    }
}

/// Writes values in the units of a sheet.
#[derive(Clone, Copy)]
pub struct Writer {
    pub system: UnitSystem,
}

impl Writer {
    /// A figure with its working.
    pub fn figure<'a>(self, figure: &'a Figure) -> Value<'a> {
        let Figure {
            rule,
            value,
            terms,
            ink: of_figure,
        } = figure;
        Value {
            ink: Some(ink(*of_figure)),
            working: Some(self.working(rule, terms)),
            shown: words::figure(figure, self.system),
            ..self.bare(*value)
        }
    }

    /// A figure which may be missing.
    pub fn maybe<'a>(self, figure: Option<&'a Arc<Figure>>) -> Option<Value<'a>> {
        figure.map(|figure| self.figure(figure))
    }

    /// A value with where it came from, which may be missing.
    pub fn given<'a, Q: Quantity>(self, given: Option<&'a Given<Q>>) -> Option<Value<'a>> {
        given.map(|given| self.from(given.value.into(), &given.origin))
    }

    /// A value with where it came from.
    pub fn from<'a>(self, amount: Amount, origin: &'a Origin) -> Value<'a> {
        let at = |field: Field, of_value: Ink| Value {
            ink: Some(ink(of_value)),
            field: Some(field_name(field).into_owned()),
            ..self.bare(amount)
        };
        match origin {
            Origin::Entered(field) => at(*field, Ink::Entered),
            Origin::Assumed(field) => at(*field, Ink::Assumed),
            Origin::Constant => Value {
                ink: Some("constant"),
                ..self.bare(amount)
            },
            // The figure stands for the amount: it is the same value.
            Origin::Figure(figure) => Value {
                ink: Some(ink(figure.ink)),
                working: Some(self.working(figure.rule, &figure.terms)),
                ..self.bare(amount)
            },
        }
    }

    /// A quantity which was entered.
    pub fn entered<'a>(self, quantity: impl Quantity) -> Value<'a> {
        Value {
            ink: Some(ink(Ink::Entered)),
            ..self.bare(quantity.into())
        }
    }

    /// A value which fills a gap.
    pub fn assumed<'a>(self, field: Field, value: &AssumedValue) -> Value<'a> {
        let of_value = match value {
            AssumedValue::Amount(amount) => self.bare(*amount),
            AssumedValue::Size(size) => self.bare(Amount::Size(*size)),
            AssumedValue::Choice(choice) => Value {
                value: Number::Name(choice_name(*choice)),
                unit: None,
                shown: String::new(),
                ink: None,
                field: None,
                working: None,
            },
        };
        Value {
            shown: words::assumed_with_unit(field, value, self.system),
            ink: Some(ink(Ink::Assumed)),
            ..of_value
        }
    }

    /// A value by itself.
    pub fn bare<'a>(self, amount: Amount) -> Value<'a> {
        let (value, unit) = match amount {
            Amount::Measured { si, kind } => (Number::Measured(si), Some(unit_name(kind))),
            Amount::Count(count) => (Number::Count(count), None),
            Amount::Size(size) => (Number::Name(size_name(size)), None),
        };
        Value {
            value,
            unit,
            shown: words::amount(amount, self.system),
            ink: None,
            field: None,
            working: None,
        }
    }

    fn working<'a>(self, rule: &Rule, terms: &'a [Term]) -> Working<'a> {
        let Rule {
            id,
            gives,
            form,
            source,
            clause,
            known: of_rule,
        } = rule;
        let Source {
            name,
            edition,
            title,
        } = source;
        let (form, expression) = match form {
            Form::Formula { expression, .. } => ("formula", Some(*expression)),
            Form::Sum => ("sum", None),
            Form::Lookup => ("lookup", None),
            Form::Choice => ("choice", None),
        };
        Working {
            rule: id,
            title: words::rule_title(rule),
            gives,
            form,
            expression,
            source: SourceName {
                name,
                edition,
                title,
            },
            clause,
            known: known(*of_rule),
            terms: Terms {
                terms,
                writer: self,
            },
        }
    }

    fn term<'a>(self, term: &'a Term) -> TermLine<'a> {
        let Term {
            symbol,
            amount,
            origin,
            whose,
        } = term;
        TermLine {
            symbol,
            whose: whose.as_deref(),
            value: self.from(*amount, origin),
        }
    }
}

fn ink(ink: Ink) -> &'static str {
    match ink {
        Ink::Entered => "entered",
        Ink::Assumed => "assumed",
        Ink::Worked => "worked",
    }
}

fn known(known: Known) -> &'static str {
    match known {
        Known::Derived => "derived",
        Known::CrossChecked => "cross_checked",
        Known::Read => "read",
        Known::CommonPractice => "common_practice",
        Known::FromMemory => "from_memory",
    }
}

/// The name of the SI unit of a kind, in plain ASCII.
fn unit_name(kind: Kind) -> &'static str {
    match kind {
        Kind::Current => "A",
        Kind::Voltage => "V",
        Kind::Power | Kind::ShaftPower => "W",
        Kind::ApparentPower => "VA",
        Kind::ImpedancePerLength => "ohm/m",
        Kind::Inductance => "H",
        Kind::Frequency => "Hz",
        Kind::Length => "m",
        Kind::Area | Kind::CrossSection => "m2",
        Kind::Temperature => "K",
        Kind::TemperatureDifference => "delta K",
        Kind::Transmittance => "W/(m2 K)",
        Kind::HeatConductance => "W/K",
        Kind::Pressure => "Pa",
        Kind::Density => "kg/m3",
        Kind::SpecificHeat => "J/(kg K)",
        Kind::AirFlow => "m3/s",
        Kind::LengthPerImpedance => "m/ohm",
        Kind::Ratio => "1",
    }
}
