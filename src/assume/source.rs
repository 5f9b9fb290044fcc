//! Another source of heat with its gaps filled.

use super::Assumption;
use super::reader::Reader;
use crate::quantity::{Current, Power, Ratio};
use crate::sheet::{Choice, Item};
use crate::working::{Field, Given, Holder};

/// Another source of heat with its gaps filled.
#[derive(Debug, Clone, PartialEq)]
pub struct SourceInputs {
    /// What it is.
    pub name: String,
    /// Whether it runs together with the feeders.
    pub is_running: bool,
    /// Its heat, where entered.
    pub heat: Option<Given<Power>>,
    /// Output of a supply, where entered.
    pub output: Option<Given<Power>>,
    /// Its efficiency; assumed only where it is needed.
    pub efficiency: Given<Ratio>,
    /// Current from the supply, where entered.
    pub current: Option<Given<Current>>,
    /// What was assumed.
    pub assumptions: Vec<Assumption>,
}

/// Efficiency of a control supply until it is entered: the low end of what is sold today. Source: common practice.
const USUAL_EFFICIENCY: Ratio = Ratio::per_cent(88.0);

/// Fills the gaps of a heat source.
pub fn source(item: &Item) -> SourceInputs {
    let mut reader = Reader::of(&item.record, Holder::Source(item.id));
    let heat = reader.quantity(Field::SourceHeat);
    let output = reader.quantity(Field::SourceOutput);
    let is_needed = heat.is_none() && output.is_some();
    let efficiency = if is_needed {
        reader.quantity_or(Field::SourceEfficiency, USUAL_EFFICIENCY)
    } else {
        reader
            .quantity(Field::SourceEfficiency)
            .unwrap_or(Given::assumed(Field::SourceEfficiency, USUAL_EFFICIENCY))
    };
    SourceInputs {
        name: reader.text(Field::SourceName),
        is_running: reader
            .choice_or(Field::SourceRunning, Choice::Together)
            .value
            == Choice::Together,
        heat,
        output,
        efficiency,
        current: reader.quantity(Field::SourceCurrent),
        assumptions: reader.into_assumptions(),
    }
}
