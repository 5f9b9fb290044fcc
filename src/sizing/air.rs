//! Where the heat goes: walls and air.

use crate::quantity::Temperature;
use crate::working::{Figure, Given};
use std::sync::Arc;

/// Temperature and airflow of the enclosure, worked. `None` where something is missing.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Air {
    /// Effective surface.
    pub surface: Option<Arc<Figure>>,
    /// Effective surface times wall coefficient.
    pub conductance: Option<Arc<Figure>>,
    /// Rise of the sealed enclosure.
    pub sealed_rise: Option<Arc<Figure>>,
    /// Temperature inside when sealed.
    pub sealed_inside: Option<Arc<Figure>>,
    /// The temperature inside by which the sheet goes: sealed, or the chosen limit where fans hold it.
    pub inside: Option<Given<Temperature>>,
    /// Pressure of the site.
    pub pressure: Option<Arc<Figure>>,
    /// Density of the air at the inlet.
    pub density: Option<Arc<Figure>>,
    /// Airflow at the inlet which holds the limit, without credit for the walls.
    pub airflow: Option<Arc<Figure>>,
    /// The same with credit for the walls.
    pub airflow_credited: Option<Arc<Figure>>,
    /// By the metric trade rule.
    pub airflow_metric_rule: Option<Arc<Figure>>,
    /// By the US trade rule.
    pub airflow_us_rule: Option<Arc<Figure>>,
}
