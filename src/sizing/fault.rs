//! Fault current at the panel by the point-to-point method.

use crate::quantity::Current;
use crate::working::{Figure, Given};
use std::sync::Arc;

/// The largest fault current, worked.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Fault {
    /// Full-load current of the transformer.
    pub transformer_current: Option<Arc<Figure>>,
    /// Fault current at the start of the incoming run: at the transformer, or as entered.
    pub at_source: Option<Given<Current>>,
    /// The factor f of the run.
    pub run_factor: Option<Arc<Figure>>,
    /// The multiplier M of the run.
    pub multiplier: Option<Arc<Figure>>,
    /// Fault current at the panel.
    pub at_panel: Option<Given<Current>>,
}
