//! Entries: what was typed into a field and taken, checked once where it is made.

use super::{Choice, LONGEST_TEXT, Shape, spec};
use crate::quantity::{Quantity, Unit, WireSize};
use crate::working::Field;
use std::collections::{BTreeMap, BTreeSet};

/// A measured value as typed: number, unit and the text itself.
#[derive(Debug, Clone, PartialEq)]
pub struct Measured {
    /// The number in `unit`; finite once in a record.
    pub number: f64,
    /// The unit typed, or the field's own unit where none was typed.
    pub unit: Unit,
    /// The text as typed.
    pub text: String,
}

impl Measured {
    /// The value in the SI unit of its kind.
    pub fn si(&self) -> f64 {
        self.unit.to_si(self.number)
    }
}

/// What was entered in one field.
#[derive(Debug, Clone, PartialEq)]
pub enum Entry {
    /// Free text.
    Text(String),
    /// A quantity.
    Measured(Measured),
    /// A number of things.
    Count(u32),
    /// One answer.
    Choice(Choice),
    /// Several answers; not empty.
    Choices(BTreeSet<Choice>),
    /// A conductor size.
    Size(WireSize),
}

/// Why an entry cannot stand in its field.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Impossible {
    /// The field takes another shape of entry, or another unit.
    WrongShape,
    /// Not a finite number.
    NotFinite,
    /// Outside the range of the field; limits in SI.
    OutOfRange {
        /// Least value.
        least: f64,
        /// Greatest value.
        most: f64,
    },
    /// Longer than the field takes.
    TooLong {
        /// Characters it takes.
        most: usize,
    },
    /// Empty where something must stand.
    Empty,
    /// Not among the answers of the field.
    NotOffered,
}

/// The entries of one holder, by field. Every entry in it fits its field.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Record {
    entries: BTreeMap<Field, Entry>,
}

impl Record {
    /// Puts `entry` into `field`, or says why it cannot stand there.
    pub fn set(&mut self, field: Field, entry: Entry) -> Result<(), Impossible> {
        check(field, &entry)?;
        self.entries.insert(field, entry);
        Ok(())
    }

    /// Empties `field`.
    pub fn clear(&mut self, field: Field) {
        self.entries.remove(&field);
    }

    /// The entry of `field`.
    pub fn get(&self, field: Field) -> Option<&Entry> {
        self.entries.get(&field)
    }

    /// All entries in the order of the fields.
    pub fn iter(&self) -> impl Iterator<Item = (Field, &Entry)> {
        self.entries.iter().map(|(field, entry)| (*field, entry))
    }

    /// Whether nothing was entered.
    pub fn is_empty(&self) -> bool {
        self.entries.is_empty()
    }

    /// The quantity of `field`.
    pub fn quantity<Q: Quantity>(&self, field: Field) -> Option<Q> {
        match (self.get(field)?, spec(field).shape) {
            (Entry::Measured(measured), Shape::Measured { kind, .. }) if kind == Q::KIND => {
                Some(Q::from_si(measured.si()))
            }
            _ => None,
        }
    }

    /// The text of `field`, empty where nothing was entered.
    pub fn text(&self, field: Field) -> &str {
        match self.get(field) {
            Some(Entry::Text(text)) => text,
            _ => "",
        }
    }

    /// The count of `field`.
    pub fn count(&self, field: Field) -> Option<u32> {
        match self.get(field)? {
            Entry::Count(count) => Some(*count),
            _ => None,
        }
    }

    /// The answer of `field`.
    pub fn choice(&self, field: Field) -> Option<Choice> {
        match self.get(field)? {
            Entry::Choice(choice) => Some(*choice),
            _ => None,
        }
    }

    /// The answers of `field`.
    pub fn choices(&self, field: Field) -> Option<&BTreeSet<Choice>> {
        match self.get(field)? {
            Entry::Choices(choices) => Some(choices),
            _ => None,
        }
    }

    /// The conductor size of `field`.
    pub fn size(&self, field: Field) -> Option<WireSize> {
        match self.get(field)? {
            Entry::Size(size) => Some(*size),
            _ => None,
        }
    }
}

fn check(field: Field, entry: &Entry) -> Result<(), Impossible> {
    match (spec(field).shape, entry) {
        (Shape::Text { longest }, Entry::Text(text)) => check_length(text, longest),
        (Shape::Measured { kind, least, most }, Entry::Measured(measured)) => {
            if !measured.unit.measures(kind) {
                return Err(Impossible::WrongShape);
            }
            check_length(&measured.text, LONGEST_TEXT)?;
            let si = measured.si();
            if !measured.number.is_finite() || !si.is_finite() {
                return Err(Impossible::NotFinite);
            }
            if crate::math::reaches(si, least) && crate::math::reaches(most, si) {
                Ok(())
            } else {
                Err(Impossible::OutOfRange { least, most })
            }
        }
        (Shape::Count { least, most }, Entry::Count(count)) => {
            if (least..=most).contains(count) {
                Ok(())
            } else {
                Err(Impossible::OutOfRange {
                    least: f64::from(least),
                    most: f64::from(most),
                })
            }
        }
        (Shape::Choice(offered), Entry::Choice(choice)) => {
            if offered.contains(choice) {
                Ok(())
            } else {
                Err(Impossible::NotOffered)
            }
        }
        (Shape::Choices(offered), Entry::Choices(chosen)) => {
            if chosen.is_empty() {
                Err(Impossible::Empty)
            } else if chosen.iter().all(|choice| offered.contains(choice)) {
                Ok(())
            } else {
                Err(Impossible::NotOffered)
            }
        }
        (Shape::Size, Entry::Size(_)) => Ok(()),
        _ => Err(Impossible::WrongShape),
    }
}

fn check_length(text: &str, most: usize) -> Result<(), Impossible> {
    if text.is_empty() {
        return Err(Impossible::Empty);
    }
    if text.chars().count() > most {
        return Err(Impossible::TooLong { most });
    }
    Ok(())
}
