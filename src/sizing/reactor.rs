//! The input reactor: whether practice asks for one, and what an entered one is.

use crate::quantity::{Current, Ratio};
use crate::working::{Figure, Given, ReactorReason};
use std::sync::Arc;

/// A reactor of a percentage, entered or advised.
#[derive(Debug, Clone, PartialEq)]
pub struct ReactorSize {
    /// Its percentage.
    pub percent: Ratio,
    /// The current to which the percentage refers.
    pub reference: Given<Current>,
    /// Inductance of each phase.
    pub inductance: Arc<Figure>,
    /// Smallest rated current, RMS.
    pub rated_current: Arc<Figure>,
    /// Its heat.
    pub heat: Arc<Figure>,
}

/// The reactor of a feeder.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Reactor {
    /// The reasons of practice which the drive's own choke does not answer.
    pub reasons: Vec<ReactorReason>,
    /// Ratio of the source's power to the drive's.
    pub source_ratio: Option<Arc<Figure>>,
    /// Source impedance on the drive's base.
    pub source_impedance: Option<Arc<Figure>>,
    /// The reactor which is entered: it counts.
    pub entered: Option<ReactorSize>,
    /// The reactor which practice advises: it counts nowhere until it is entered.
    pub advised: Option<ReactorSize>,
}
