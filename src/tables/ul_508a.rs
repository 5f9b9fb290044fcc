//! UL 508A, Table 28.1: ampacity of copper power conductors inside the enclosure.
//!
//! The whole table is known from memory; 14 to 10 AWG differ between printings and stand here with the lower values.

use super::{Column, Known};
use crate::quantity::{Current, WireSize};

/// A row of Table 28.1.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct InsideRow {
    /// The conductor.
    pub size: WireSize,
    amperes_60: Option<f64>,
    amperes_75: f64,
}

impl InsideRow {
    /// The ampacity in `column`; the table has no 90 °C column, and 60 °C only up to 1 AWG.
    pub fn ampacity(&self, column: Column) -> Option<Current> {
        match column {
            Column::C60 => self.amperes_60,
            Column::C75 => Some(self.amperes_75),
            Column::C90 => None,
        }
        .map(Current::amperes)
    }
}

/// How the cells of Table 28.1 are known.
pub const INSIDE_ROWS_KNOWN: Known = Known::FromMemory;

/// The row of Table 28.1 for `size`.
pub fn inside_row(size: WireSize) -> Option<InsideRow> {
    INSIDE_ROWS.iter().find(|row| row.size == size).copied()
}

const fn row(size: WireSize, amperes_60: Option<f64>, amperes_75: f64) -> InsideRow {
    InsideRow {
        size,
        amperes_60,
        amperes_75,
    }
}

/// Table 28.1: size, amperes at 60 °C, amperes at 75 °C.
#[rustfmt::skip]
pub static INSIDE_ROWS: [InsideRow; 24] = [
    row(WireSize::Awg14, Some(15.0), 15.0),
    row(WireSize::Awg12, Some(20.0), 20.0),
    row(WireSize::Awg10, Some(30.0), 30.0),
    row(WireSize::Awg8, Some(40.0), 50.0),
    row(WireSize::Awg6, Some(55.0), 65.0),
    row(WireSize::Awg4, Some(70.0), 85.0),
    row(WireSize::Awg3, Some(85.0), 100.0),
    row(WireSize::Awg2, Some(95.0), 115.0),
    row(WireSize::Awg1, Some(110.0), 130.0),
    row(WireSize::Awg1Over0, None, 150.0),
    row(WireSize::Awg2Over0, None, 175.0),
    row(WireSize::Awg3Over0, None, 200.0),
    row(WireSize::Awg4Over0, None, 230.0),
    row(WireSize::Kcmil250, None, 255.0),
    row(WireSize::Kcmil300, None, 285.0),
    row(WireSize::Kcmil350, None, 310.0),
    row(WireSize::Kcmil400, None, 335.0),
    row(WireSize::Kcmil500, None, 380.0),
    row(WireSize::Kcmil600, None, 420.0),
    row(WireSize::Kcmil700, None, 460.0),
    row(WireSize::Kcmil750, None, 475.0),
    row(WireSize::Kcmil800, None, 490.0),
    row(WireSize::Kcmil900, None, 520.0),
    row(WireSize::Kcmil1000, None, 545.0),
];
