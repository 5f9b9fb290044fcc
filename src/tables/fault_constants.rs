//! The constants C of the point-to-point fault current method: 600 V class, three single conductors in conduit.
//!
//! Published in plan-review handbooks; the aluminium values in steel conduit for 14 to 8 AWG are from memory.

use super::{Conduit, Known, Metal};
use crate::quantity::{LengthPerImpedance, WireSize};

/// A row of the C table, feet for an ohm.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FaultConstantRow {
    /// The conductor.
    pub size: WireSize,
    copper_steel: f64,
    copper_nonmagnetic: f64,
    aluminium_steel: f64,
    aluminium_nonmagnetic: Option<f64>,
}

impl FaultConstantRow {
    /// The constant for `metal` in `conduit` with how it is known; `None` where the cell could not be read.
    pub fn constant(&self, metal: Metal, conduit: Conduit) -> Option<(LengthPerImpedance, Known)> {
        let (feet_per_ohm, known) = match (metal, conduit) {
            (Metal::Copper, Conduit::Steel) => (self.copper_steel, Known::Read),
            (Metal::Copper, Conduit::Pvc | Conduit::Aluminium) => {
                (self.copper_nonmagnetic, Known::Read)
            }
            (Metal::Aluminium, Conduit::Steel) => {
                (self.aluminium_steel, self.aluminium_steel_known())
            }
            (Metal::Aluminium, Conduit::Pvc | Conduit::Aluminium) => {
                (self.aluminium_nonmagnetic?, Known::Read)
            }
        };
        Some((LengthPerImpedance::feet_per_ohm(feet_per_ohm), known))
    }

    fn aluminium_steel_known(&self) -> Known {
        if self.size <= WireSize::Awg8 {
            Known::FromMemory
        } else {
            Known::Read
        }
    }
}

/// The row for `size`; there is none for 700, 800 and 900 kcmil nor above 1000.
pub fn fault_constant_row(size: WireSize) -> Option<FaultConstantRow> {
    FAULT_CONSTANT_ROWS
        .iter()
        .find(|row| row.size == size)
        .copied()
}

const fn row(
    size: WireSize,
    [copper_steel, copper_nonmagnetic]: [f64; 2],
    aluminium_steel: f64,
    aluminium_nonmagnetic: Option<f64>,
) -> FaultConstantRow {
    FaultConstantRow {
        size,
        copper_steel,
        copper_nonmagnetic,
        aluminium_steel,
        aluminium_nonmagnetic,
    }
}

/// Size; copper in steel and in nonmagnetic conduit; aluminium in steel; aluminium in nonmagnetic conduit.
#[rustfmt::skip]
pub static FAULT_CONSTANT_ROWS: [FaultConstantRow; 21] = [
    row(WireSize::Awg14, [389.0, 389.0], 237.0, Some(237.0)),
    row(WireSize::Awg12, [617.0, 617.0], 376.0, Some(376.0)),
    row(WireSize::Awg10, [981.0, 982.0], 599.0, Some(599.0)),
    row(WireSize::Awg8, [1557.0, 1559.0], 951.0, Some(952.0)),
    row(WireSize::Awg6, [2425.0, 2430.0], 1481.0, Some(1482.0)),
    row(WireSize::Awg4, [3806.0, 3826.0], 2346.0, Some(2350.0)),
    row(WireSize::Awg3, [4774.0, 4811.0], 2952.0, Some(2961.0)),
    row(WireSize::Awg2, [5907.0, 6044.0], 3713.0, Some(3730.0)),
    row(WireSize::Awg1, [7293.0, 7493.0], 4645.0, Some(4678.0)),
    row(WireSize::Awg1Over0, [8925.0, 9317.0], 5777.0, Some(5838.0)),
    row(WireSize::Awg2Over0, [10755.0, 11424.0], 7187.0, Some(7301.0)),
    row(WireSize::Awg3Over0, [12844.0, 13923.0], 8826.0, Some(9110.0)),
    row(WireSize::Awg4Over0, [15082.0, 16673.0], 10741.0, Some(11174.0)),
    row(WireSize::Kcmil250, [16483.0, 18594.0], 12122.0, Some(12862.0)),
    row(WireSize::Kcmil300, [18177.0, 20868.0], 13910.0, Some(14923.0)),
    row(WireSize::Kcmil350, [19704.0, 22737.0], 15484.0, Some(16813.0)),
    row(WireSize::Kcmil400, [20566.0, 24297.0], 16671.0, Some(18506.0)),
    row(WireSize::Kcmil500, [22185.0, 26706.0], 18756.0, Some(21391.0)),
    row(WireSize::Kcmil600, [22965.0, 28033.0], 20093.0, None),
    row(WireSize::Kcmil750, [24137.0, 29735.0], 21766.0, None),
    row(WireSize::Kcmil1000, [25278.0, 31491.0], 23478.0, None),
];
