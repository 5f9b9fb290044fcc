//! Heat of the parts of a feeder, and of other sources.

use crate::working::Figure;
use std::sync::Arc;

/// The heat of a feeder's parts at full load. `None` where it could not be worked, or where there is no such part.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct FeederHeat {
    /// Loss of the drive in all.
    pub drive: Option<Arc<Figure>>,
    /// The part of it which stays in the enclosure.
    pub drive_inside: Option<Arc<Figure>>,
    /// The entered reactor.
    pub reactor: Option<Arc<Figure>>,
    /// The branch device.
    pub device: Option<Arc<Figure>>,
    /// Conductors inside.
    pub conductors: Option<Arc<Figure>>,
    /// Everything of this feeder inside.
    pub total: Option<Arc<Figure>>,
}
