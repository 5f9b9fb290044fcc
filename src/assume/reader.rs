//! Reads a record and remembers what it had to fill in.

use super::{AssumedValue, Assumption};
use crate::quantity::Quantity;
use crate::sheet::{Choice, Record};
use crate::tables::{Column, Conduit, DeviceType, Metal};
use crate::working::{Amount, Field, Given, Holder, Place};

/// Reads one record; what is missing is filled and noted.
pub(super) struct Reader<'a> {
    record: &'a Record,
    holder: Holder,
    assumptions: Vec<Assumption>,
}

impl<'a> Reader<'a> {
    pub(super) fn of(record: &'a Record, holder: Holder) -> Self {
        Self {
            record,
            holder,
            assumptions: Vec::new(),
        }
    }

    pub(super) fn into_assumptions(self) -> Vec<Assumption> {
        self.assumptions
    }

    pub(super) fn text(&self, field: Field) -> String {
        self.record.text(field).to_owned()
    }

    pub(super) fn record(&self) -> &'a Record {
        self.record
    }

    /// The quantity of `field`, where entered.
    pub(super) fn quantity<Q: Quantity>(&self, field: Field) -> Option<Given<Q>> {
        self.record
            .quantity(field)
            .map(|value| Given::entered(field, value))
    }

    /// The quantity of `field`, else `otherwise`, assumed.
    pub(super) fn quantity_or<Q: Quantity + Into<Amount>>(
        &mut self,
        field: Field,
        otherwise: Q,
    ) -> Given<Q> {
        self.quantity(field).unwrap_or_else(|| {
            self.note(field, AssumedValue::Amount(otherwise.into()));
            Given::assumed(field, otherwise)
        })
    }

    /// The count of `field`, else `otherwise`, assumed.
    pub(super) fn count_or(&mut self, field: Field, otherwise: u32) -> Given<u32> {
        match self.record.count(field) {
            Some(count) => Given::entered(field, count),
            None => {
                self.note(field, AssumedValue::Amount(Amount::Count(otherwise)));
                Given::assumed(field, otherwise)
            }
        }
    }

    /// The answer of `field`, else `otherwise`, assumed.
    pub(super) fn choice_or(&mut self, field: Field, otherwise: Choice) -> Given<Choice> {
        match self.record.choice(field) {
            Some(choice) => Given::entered(field, choice),
            None => {
                self.note(field, AssumedValue::Choice(otherwise));
                Given::assumed(field, otherwise)
            }
        }
    }

    /// The answer of `field` where it only switches something: assumed silently as `otherwise`.
    pub(super) fn quiet_choice_or(&self, field: Field, otherwise: Choice) -> Choice {
        self.record.choice(field).unwrap_or(otherwise)
    }

    fn note(&mut self, field: Field, value: AssumedValue) {
        self.assumptions.push(Assumption {
            place: Place {
                holder: self.holder,
                field,
            },
            value,
        });
    }
}

/// The same origin with another value.
pub(super) fn mapped<T, U>(given: Given<T>, map: impl FnOnce(T) -> U) -> Given<U> {
    Given {
        value: map(given.value),
        origin: given.origin,
    }
}

pub(super) fn metal(choice: Choice) -> Metal {
    match choice {
        Choice::Aluminium => Metal::Aluminium,
        _ => Metal::Copper,
    }
}

pub(super) fn conduit(choice: Choice) -> Conduit {
    match choice {
        Choice::PvcConduit => Conduit::Pvc,
        Choice::AluminiumConduit => Conduit::Aluminium,
        _ => Conduit::Steel,
    }
}

pub(super) fn column(choice: Choice) -> Column {
    match choice {
        Choice::Insulation60 => Column::C60,
        Choice::Insulation90 => Column::C90,
        _ => Column::C75,
    }
}

pub(super) fn device(choice: Choice) -> DeviceType {
    match choice {
        Choice::NontimeDelayFuse => DeviceType::NontimeDelayFuse,
        Choice::ClassCcFuse => DeviceType::ClassCcFuse,
        Choice::InverseTimeBreaker => DeviceType::InverseTimeBreaker,
        _ => DeviceType::TimeDelayFuse,
    }
}
