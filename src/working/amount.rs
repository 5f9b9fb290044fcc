//! Amounts, and figures with the terms from which they came.

use super::{Field, Rule};
use crate::quantity::{Kind, Quantity, WireSize};
use std::sync::Arc;

/// A value of any kind, for showing: the typed quantities are erased only here.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Amount {
    /// A quantity in the SI unit of its kind.
    Measured {
        /// The value in SI.
        si: f64,
        /// Its kind.
        kind: Kind,
    },
    /// A number of things.
    Count(u32),
    /// A conductor size.
    Size(WireSize),
}

impl Amount {
    /// The amount as a quantity of the kind asked for; `None` where it is of another kind.
    pub fn quantity<Q: Quantity>(self) -> Option<Q> {
        match self {
            Amount::Measured { si, kind } if kind == Q::KIND => Some(Q::from_si(si)),
            _ => None,
        }
    }
}

impl<Q: Quantity> From<Q> for Amount {
    fn from(quantity: Q) -> Self {
        Amount::Measured {
            si: quantity.si(),
            kind: Q::KIND,
        }
    }
}

impl From<WireSize> for Amount {
    fn from(size: WireSize) -> Self {
        Amount::Size(size)
    }
}

impl From<u32> for Amount {
    fn from(count: u32) -> Self {
        Amount::Count(count)
    }
}

/// Where a value comes from: the three inks of screen and paper.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Ink {
    /// Typed by the person.
    Entered,
    /// Filled in until somebody types it.
    Assumed,
    /// Calculated.
    Worked,
}

/// Where a term's number came from.
#[derive(Debug, Clone, PartialEq)]
pub enum Origin {
    /// Typed at this field.
    Entered(Field),
    /// Filled in for this field.
    Assumed(Field),
    /// A constant of the rule or of nature.
    Constant,
    /// Another figure.
    Figure(Arc<Figure>),
}

/// One number put into a rule.
#[derive(Debug, Clone, PartialEq)]
pub struct Term {
    /// The symbol in the rule.
    pub symbol: &'static str,
    /// The number.
    pub amount: Amount,
    /// Where it came from.
    pub origin: Origin,
    /// The tag or name of the feeder or source which it belongs to, where a rule takes terms of several.
    pub whose: Option<Arc<str>>,
}

impl Term {
    /// A constant of the rule itself.
    pub fn constant(symbol: &'static str, amount: impl Into<Amount>) -> Self {
        Self {
            symbol,
            amount: amount.into(),
            origin: Origin::Constant,
            whose: None,
        }
    }

    /// The same term, told apart from those of other feeders.
    pub fn belonging_to(self, whose: &Arc<str>) -> Self {
        Self {
            whose: Some(Arc::clone(whose)),
            ..self
        }
    }

    /// The value of another figure.
    pub fn of(symbol: &'static str, figure: &Arc<Figure>) -> Self {
        Self {
            symbol,
            amount: figure.value,
            origin: Origin::Figure(Arc::clone(figure)),
            whose: None,
        }
    }
}

/// The sum of the measured terms of a [`super::Form::Sum`] rule, in SI.
pub fn sum_of_terms(terms: &[Term]) -> f64 {
    terms
        .iter()
        .filter_map(|term| match term.amount {
            Amount::Measured { si, .. } => Some(si),
            Amount::Count(_) | Amount::Size(_) => None,
        })
        // Not `sum`: that of nothing is minus nought.
        .fold(0.0, |sum, part| sum + part)
}

/// One worked (or assumed) value with its working: a tree whose leaves are entered and assumed values.
#[derive(Debug, Clone, PartialEq)]
pub struct Figure {
    /// The rule which gave the value.
    pub rule: &'static Rule,
    /// The value.
    pub value: Amount,
    /// What was put into the rule, in the order of its symbols.
    pub terms: Vec<Term>,
    /// Worked, or assumed by a rule.
    pub ink: Ink,
}

impl Figure {
    /// The value as a quantity of the kind asked for; `None` where the figure is of another kind.
    pub fn quantity<Q: Quantity>(&self) -> Option<Q> {
        self.value.quantity()
    }

    /// Whether anything below this figure, or itself, is assumed.
    pub fn rests_on_assumption(&self) -> bool {
        self.ink == Ink::Assumed
            || self.terms.iter().any(|term| match &term.origin {
                Origin::Assumed(_) => true,
                Origin::Figure(figure) => figure.rests_on_assumption(),
                Origin::Entered(_) | Origin::Constant => false,
            })
    }
}

/// A value together with where it came from: what the rules of `sizing` take.
#[derive(Debug, Clone, PartialEq)]
pub struct Given<T> {
    /// The value.
    pub value: T,
    /// Where it came from.
    pub origin: Origin,
}

impl<T> Given<T> {
    /// A value typed at `field`.
    pub fn entered(field: Field, value: T) -> Self {
        Self {
            value,
            origin: Origin::Entered(field),
        }
    }

    /// A value filled in for `field`.
    pub fn assumed(field: Field, value: T) -> Self {
        Self {
            value,
            origin: Origin::Assumed(field),
        }
    }

    /// Whether the person typed it.
    pub fn is_entered(&self) -> bool {
        matches!(self.origin, Origin::Entered(_))
    }

    /// The ink in which the value is shown.
    pub fn ink(&self) -> Ink {
        match &self.origin {
            Origin::Entered(_) => Ink::Entered,
            Origin::Assumed(_) => Ink::Assumed,
            Origin::Constant => Ink::Worked,
            Origin::Figure(figure) => figure.ink,
        }
    }
}

impl<T: Copy + Into<Amount>> Given<T> {
    /// This value as a term under `symbol`.
    pub fn term(&self, symbol: &'static str) -> Term {
        Term {
            symbol,
            amount: self.value.into(),
            origin: self.origin.clone(),
            whose: None,
        }
    }
}

impl<Q: Quantity> Given<Q> {
    /// The quantity of a figure, with the figure as its origin; `None` where the figure is of another kind.
    pub fn from_figure(figure: &Arc<Figure>) -> Option<Self> {
        Some(Self {
            value: figure.quantity()?,
            origin: Origin::Figure(Arc::clone(figure)),
        })
    }
}
