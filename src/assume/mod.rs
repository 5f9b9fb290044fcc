//! Fills what is missing. Every filled value is marked as assumed; entered values pass as they are.
//!
//! Here: entries of a record become typed values with their origin. Not here: choices between rules, and the drive's
//! rated input current and the losses, which are assumed by rules with a working of their own (`sizing`).
//! Start with [`site()`] and [`feeder()`].

mod feeder;
mod reader;
mod site;
mod source;

pub use feeder::{FeederInputs, feeder};
pub use site::{EnclosureInputs, SheetInputs, Site, site};
pub use source::{SourceInputs, source};

use crate::quantity::WireSize;
use crate::sheet::Choice;
use crate::working::{Amount, Place};

/// A value filled in for a field.
#[derive(Debug, Clone, PartialEq)]
pub enum AssumedValue {
    /// A quantity or count.
    Amount(Amount),
    /// An answer.
    Choice(Choice),
    /// A conductor size.
    Size(WireSize),
}

/// An assumption: which field was filled with what. `words` gives the reason for each field.
#[derive(Debug, Clone, PartialEq)]
pub struct Assumption {
    /// The field.
    pub place: Place,
    /// The value.
    pub value: AssumedValue,
}
