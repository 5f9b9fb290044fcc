//! Pure formulas on quantities: circuits, fault currents, heat, air.
//!
//! Here: one function for each published relation. Not here: tables, choices between formulas, the sheet.
//! Each function states its formula, its symbols and its source.

pub mod air;
pub mod circuit;
pub mod heat;
