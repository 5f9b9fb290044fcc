//! Typed or pasted text into entries, or a refusal which says what would be taken.
//!
//! Here: numbers with either decimal mark and a unit, fractions of a horsepower, conductor sizes, counts, choices and
//! text, read for the field they were typed into. Not here: ranges and offers (`sheet`), sentences (`words`), and any
//! guess: what can be read in two ways is refused with both readings. Start with [`read`].

mod choices;
mod numeral;
mod sizes;
mod units;

pub use choices::choice_spellings;
pub use units::{unit_spellings, units_for};

use crate::quantity::{Kind, Unit, WireSize};
use crate::sheet::{Choice, Entry, LONGEST_TEXT, Measured, Record, Shape, UnitSystem, spec};
use crate::working::Field;
use numeral::{Numeral, Value};

/// Why a text was not taken, with what a remedy needs. Texts are as typed, without the blanks around them.
#[derive(Debug, Clone, PartialEq)]
pub enum Refusal {
    /// No number begins the text, or something stands in its midst.
    NotANumber {
        /// What was typed.
        text: String,
    },
    /// A mark in the number may part thousands or decimals.
    TwoReadings {
        /// What was typed.
        text: String,
        /// The number where the mark parts thousands, and where it begins the decimals.
        readings: [f64; 2],
        /// The unit typed, or that of the field.
        unit: Unit,
    },
    /// No unit is written so.
    UnknownUnit {
        /// What stands after the number.
        unit: String,
        /// Units which fit the field.
        fits: Vec<Unit>,
    },
    /// The unit measures something else.
    WrongUnit {
        /// What stands after the number.
        unit: String,
        /// Units which fit the field.
        fits: Vec<Unit>,
    },
    /// Outside what the field takes.
    OutOfRange {
        /// What was typed.
        text: String,
        /// Least value, in SI.
        least: f64,
        /// Greatest value, in SI.
        most: f64,
        /// The unit typed, or that of the field.
        unit: Unit,
    },
    /// Not a whole number.
    NotWhole {
        /// What was typed.
        text: String,
        /// Least count.
        least: u32,
        /// Greatest count.
        most: u32,
    },
    /// A whole number, but too small or too large.
    CountOutOfRange {
        /// What was typed.
        text: String,
        /// Least count.
        least: u32,
        /// Greatest count.
        most: u32,
    },
    /// None of the answers of the field begins so.
    NotOffered {
        /// What was typed.
        text: String,
        /// The answers.
        offered: &'static [Choice],
    },
    /// Several answers begin so.
    SeveralFit {
        /// What was typed.
        text: String,
        /// Those answers.
        fitting: Vec<Choice>,
    },
    /// No conductor is made in this size, or none that the tables know.
    UnknownSize {
        /// What was typed.
        text: String,
        /// The next smaller size, where the text says how large it would be.
        smaller: Option<WireSize>,
        /// The next larger size, likewise.
        larger: Option<WireSize>,
    },
    /// A metric size, of which the tables of this basis know none.
    MetricSize {
        /// What was typed.
        text: String,
        /// The smallest size of the tables with at least this area; none is so large.
        larger: Option<WireSize>,
    },
    /// Longer than the field takes.
    TooLong {
        /// Characters typed.
        length: usize,
        /// Characters it takes.
        most: usize,
    },
    /// Holds a character which cannot be seen or printed, such as a tab or a line end.
    ControlCharacter {
        /// What was typed.
        text: String,
    },
}

/// The entry which `text` means in `field`, on a sheet read in `system`; `None` where nothing was typed.
///
/// Every entry given fits its field: [`Record::set`] takes it.
pub fn read(field: Field, system: UnitSystem, text: &str) -> Result<Option<Entry>, Refusal> {
    let text = text.trim();
    if text.is_empty() {
        return Ok(None);
    }
    // Before anything is read, so that no refusal carries a whole pasted page.
    check_length(text, LONGEST_TEXT)?;
    if text.chars().any(char::is_control) {
        return Err(Refusal::ControlCharacter {
            text: text.to_owned(),
        });
    }
    let entry = match spec(field).shape {
        Shape::Text { longest } => {
            check_length(text, longest)?;
            Entry::Text(text.to_owned())
        }
        Shape::Measured { kind, least, most } => {
            let measured = measured(kind, spec(field).unit(system), text)?;
            let refusal = Refusal::OutOfRange {
                text: text.to_owned(),
                least,
                most,
                unit: measured.unit,
            };
            in_range(field, Entry::Measured(measured), refusal)?
        }
        Shape::Count { least, most } => {
            let out_of_range = Refusal::CountOutOfRange {
                text: text.to_owned(),
                least,
                most,
            };
            let count = count(text, least, most)?.ok_or_else(|| out_of_range.clone())?;
            in_range(field, Entry::Count(count), out_of_range)?
        }
        Shape::Choice(offered) => Entry::Choice(choices::one(text, offered)?),
        Shape::Choices(offered) => Entry::Choices(choices::several(text, offered)?),
        Shape::Size => Entry::Size(sizes::size(text)?),
    };
    Ok(Some(entry))
}

/// The entry, or `refusal` where the record does not take it: so there is one judge of ranges.
fn in_range(field: Field, entry: Entry, refusal: Refusal) -> Result<Entry, Refusal> {
    match Record::default().set(field, entry.clone()) {
        Ok(()) => Ok(entry),
        Err(_) => Err(refusal),
    }
}

fn check_length(text: &str, most: usize) -> Result<(), Refusal> {
    let length = text.chars().count();
    if length > most {
        return Err(Refusal::TooLong { length, most });
    }
    Ok(())
}

fn measured(kind: Kind, unit_of_field: Unit, text: &str) -> Result<Measured, Refusal> {
    let not_a_number = || Refusal::NotANumber {
        text: text.to_owned(),
    };
    let (value, rest) = match numeral::fraction(text) {
        Some((number, rest)) if takes_fractions(kind) => (Value::Sure(number), rest),
        _ => {
            let (numeral, rest) = Numeral::split_from(text).ok_or_else(not_a_number)?;
            (numeral.value().ok_or_else(not_a_number)?, rest)
        }
    };
    let unit = match rest.trim() {
        "" => unit_of_field,
        typed => units::unit(typed, kind)?,
    };
    match value {
        Value::Sure(number) => Ok(Measured {
            number,
            unit,
            text: text.to_owned(),
        }),
        Value::Either(readings) => Err(Refusal::TwoReadings {
            text: text.to_owned(),
            readings,
            unit,
        }),
    }
}

/// Motors are sold by halves and quarters of a horsepower, and lengths measured by fractions of an inch. Elsewhere a
/// stroke is no number.
fn takes_fractions(kind: Kind) -> bool {
    matches!(kind, Kind::ShaftPower | Kind::Length)
}

/// The whole number in `text`; `None` where it has more digits than any count.
fn count(text: &str, least: u32, most: u32) -> Result<Option<u32>, Refusal> {
    let not_whole = || Refusal::NotWhole {
        text: text.to_owned(),
        least,
        most,
    };
    let (numeral, rest) = Numeral::split_from(text).ok_or_else(not_whole)?;
    if !rest.is_empty() {
        return Err(not_whole());
    }
    let digits = numeral.whole_digits().ok_or_else(not_whole)?;
    Ok(digits.parse().ok())
}
