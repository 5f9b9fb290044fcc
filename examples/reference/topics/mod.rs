//! The topics which a row may have: each hands its inputs to the core and reads what comes out.

mod air;
mod circuit;
mod conductors;
mod devices;
mod drop;
mod heat;
mod later;
mod panel;

use super::keys::{Answers, Inputs, Key, Takes, Value, endings};
use std::sync::Arc;
use ventrail::quantity::{Quantity, Temperature, WireSize};
use ventrail::tables::{Column, Conduit, DeviceType, Metal};
use ventrail::working::{Amount, Figure, Given, Origin};

/// How a topic is worked.
#[derive(Debug, Clone, Copy)]
pub enum Work {
    /// By the core of today.
    Now(fn(&Inputs) -> Result<Answers, String>),
    /// Not yet: its rows are kept, and skipped.
    Later,
}

/// One topic.
#[derive(Debug, Clone, Copy)]
pub struct Topic {
    /// Its name in the files.
    pub name: &'static str,
    /// What is worked, and through which functions of the core.
    pub about: &'static str,
    /// What may be put in.
    pub inputs: &'static [Key],
    /// What may be expected.
    pub expected: &'static [Key],
    /// How it is worked.
    pub work: Work,
}

/// Every topic: first those which are worked.
pub fn all() -> impl Iterator<Item = &'static Topic> {
    [
        conductors::TOPICS,
        drop::TOPICS,
        devices::TOPICS,
        panel::TOPICS,
        circuit::TOPICS,
        heat::TOPICS,
        air::TOPICS,
        later::TOPICS,
    ]
    .into_iter()
    .flatten()
}

/// The topic of this name.
pub fn topic_named(name: &str) -> Option<&'static Topic> {
    all().find(|topic| topic.name == name)
}

/// The topics with their keys, as text.
pub fn listing() -> String {
    let mut text = String::new();
    for topic in all().filter(|topic| matches!(topic.work, Work::Now(_))) {
        text.push_str(&format!("{}\n  {}\n", topic.name, topic.about));
        for (title, keys) in [("inputs", topic.inputs), ("expected", topic.expected)] {
            text.push_str(&format!("  {title}:\n"));
            for key in keys {
                text.push_str(&format!("    {}\n", described(key, title == "inputs")));
            }
        }
    }
    text.push_str("not worked yet: rows of these topics are unsupported\n");
    for topic in all().filter(|topic| matches!(topic.work, Work::Later)) {
        text.push_str(&format!("  {}: {}\n", topic.name, topic.about));
    }
    text
}

/// A key with its ending, what stands under it and what it means.
pub fn described(key: &Key, is_input: bool) -> String {
    let ended = |kind| {
        let endings: Vec<String> = endings(kind)
            .iter()
            .map(|ending| match *ending {
                "" => key.stem.to_owned(),
                ending => format!("{}_{ending}", key.stem),
            })
            .collect();
        endings.join(" | ")
    };
    let name = match key.takes {
        Takes::Measured(kind) => ended(kind),
        Takes::Several(kind) => format!("{} (several, parted by commas)", ended(kind)),
        Takes::Number => format!("{} (a number)", key.stem),
        Takes::Count => format!("{} (a whole number)", key.stem),
        Takes::Counts => format!("{} (whole numbers, parted by commas)", key.stem),
        Takes::Size => format!("{} (a conductor size: 12, 1/0, 250)", key.stem),
        Takes::Sizes => format!("{} (conductor sizes, parted by commas)", key.stem),
        Takes::Word(offered) => format!("{} ({})", key.stem, offered.join(" | ")),
    };
    let need = match (is_input, key.is_needed) {
        (true, false) => "optional; ",
        _ => "",
    };
    format!("{name}: {need}{}", key.about)
}

/// A value which comes from a row.
fn given<T>(value: T) -> Given<T> {
    Given {
        value,
        origin: Origin::Constant,
    }
}

/// The figure of the rule `id` in the working of `figure`, itself included.
fn step<'a>(figure: &'a Figure, id: &str) -> Option<&'a Figure> {
    if figure.rule.id == id {
        return Some(figure);
    }
    figure.terms.iter().find_map(|term| match &term.origin {
        Origin::Figure(below) => step(below, id),
        _ => None,
    })
}

/// Gathers what the core gave; what it did not give is left out.
#[derive(Debug, Default)]
struct Gathered(Answers);

impl Gathered {
    fn amount(&mut self, stem: &'static str, amount: Amount) -> &mut Self {
        let value = match amount {
            Amount::Measured { si, .. } => Value::Number(si),
            Amount::Count(count) => Value::Word(count.to_string()),
            Amount::Size(size) => Value::Word(size.number().to_owned()),
        };
        self.0.insert(stem, value);
        self
    }

    fn quantity<Q: Quantity>(&mut self, stem: &'static str, quantity: Option<Q>) -> &mut Self {
        match quantity {
            Some(quantity) => self.number(stem, quantity.si()),
            None => self,
        }
    }

    fn given<Q: Quantity>(&mut self, stem: &'static str, given: Option<&Given<Q>>) -> &mut Self {
        self.quantity(stem, given.map(|given| given.value))
    }

    fn figure(&mut self, stem: &'static str, figure: Option<&Arc<Figure>>) -> &mut Self {
        match figure {
            Some(figure) => self.amount(stem, figure.value),
            None => self,
        }
    }

    /// The value of a step in the working of `figure`.
    fn step(&mut self, stem: &'static str, figure: Option<&Arc<Figure>>, id: &str) -> &mut Self {
        match figure.and_then(|figure| step(figure, id)) {
            Some(step) => self.amount(stem, step.value),
            None => self,
        }
    }

    fn size(&mut self, stem: &'static str, size: Option<WireSize>) -> &mut Self {
        match size {
            Some(size) => self.amount(stem, Amount::Size(size)),
            None => self,
        }
    }

    fn number(&mut self, stem: &'static str, number: f64) -> &mut Self {
        self.0.insert(stem, Value::Number(number));
        self
    }

    fn numbers<Q: Quantity>(&mut self, stem: &'static str, numbers: &[Q]) -> &mut Self {
        let numbers = numbers.iter().map(|number| number.si()).collect();
        self.0.insert(stem, Value::Numbers(numbers));
        self
    }

    fn word(&mut self, stem: &'static str, word: &str) -> &mut Self {
        self.0.insert(stem, Value::Word(word.to_owned()));
        self
    }

    fn done(&mut self) -> Result<Answers, String> {
        Ok(core::mem::take(&mut self.0))
    }
}

const METALS: &[&str] = &["copper", "aluminium"];
const CONDUITS: &[&str] = &["steel", "pvc", "aluminium"];
const DEVICES: &[&str] = &[
    "time-delay fuse",
    "nontime-delay fuse",
    "class CC fuse",
    "inverse time breaker",
];

/// Copper where nothing else is put in.
fn metal(inputs: &Inputs) -> Metal {
    match inputs.word("metal") {
        Some("aluminium") => Metal::Aluminium,
        _ => Metal::Copper,
    }
}

/// Steel where nothing else is put in.
fn conduit(inputs: &Inputs) -> Conduit {
    match inputs.word("conduit") {
        Some("pvc") => Conduit::Pvc,
        Some("aluminium") => Conduit::Aluminium,
        _ => Conduit::Steel,
    }
}

fn device(word: Option<&str>) -> Option<DeviceType> {
    Some(match word? {
        "time-delay fuse" => DeviceType::TimeDelayFuse,
        "nontime-delay fuse" => DeviceType::NontimeDelayFuse,
        "class CC fuse" => DeviceType::ClassCcFuse,
        "inverse time breaker" => DeviceType::InverseTimeBreaker,
        _ => return None,
    })
}

/// The temperature column of a table under `stem`; `None` where it is left out.
fn column(inputs: &Inputs, stem: &'static str) -> Result<Option<Column>, String> {
    let Some(temperature) = inputs.maybe::<Temperature>(stem) else {
        return Ok(None);
    };
    [Column::C60, Column::C75, Column::C90]
        .into_iter()
        .find(|column| {
            let edge = Temperature::celsius(f64::from(column.celsius()));
            (edge - temperature).to_kelvin().abs() < 0.01
        })
        .map(Some)
        .ok_or_else(|| format!("{stem} must be 60, 75 or 90 degrees Celsius"))
}
