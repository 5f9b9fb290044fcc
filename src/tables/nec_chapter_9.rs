//! NEC 2023, Chapter 9: Table 8 (area and direct-current resistance) and Table 9 (alternating-current impedance).

use super::{Conduit, Metal};
use crate::quantity::{CrossSection, ImpedancePerLength, WireSize};

/// A row of Table 8, stranded conductors, uncoated copper.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ConductorRow {
    /// The conductor.
    pub size: WireSize,
    /// Its area.
    pub area: CrossSection,
    /// Direct-current resistance at 75 °C, ohms for 1000 ft, copper.
    copper: f64,
    /// The same for aluminium.
    aluminium: f64,
}

impl ConductorRow {
    /// Direct-current resistance at 75 °C.
    pub fn resistance(&self, metal: Metal) -> ImpedancePerLength {
        ImpedancePerLength::ohms_per_thousand_feet(match metal {
            Metal::Copper => self.copper,
            Metal::Aluminium => self.aluminium,
        })
    }
}

/// The row of Table 8 for `size`; sizes above 1000 kcmil have none here.
pub fn conductor_row(size: WireSize) -> Option<ConductorRow> {
    CONDUCTOR_ROWS.iter().find(|row| row.size == size).copied()
}

/// The area of `size`: exact for sizes in circular mils, by Table 8 for gauge sizes.
pub fn area(size: WireSize) -> CrossSection {
    conductor_row(size).map_or_else(
        || {
            let thousands = match size {
                WireSize::Kcmil1250 => 1250.0,
                WireSize::Kcmil1500 => 1500.0,
                WireSize::Kcmil1750 => 1750.0,
                _ => 2000.0,
            };
            CrossSection::circular_mils(thousands * 1000.0)
        },
        |row| row.area,
    )
}

/// The smallest size whose area is at least `wanted`.
pub fn size_of_area(wanted: CrossSection) -> Option<WireSize> {
    WireSize::ALL.into_iter().find(|size| {
        crate::math::reaches(area(*size).to_circular_mils(), wanted.to_circular_mils())
    })
}

/// Resistance and reactance of one conductor to neutral.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Impedance {
    /// Alternating-current resistance.
    pub resistance: ImpedancePerLength,
    /// Reactance.
    pub reactance: ImpedancePerLength,
}

/// A row of Table 9, ohms to neutral for 1000 ft: 75 °C, 60 Hz, three single conductors in conduit.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ImpedanceRow {
    /// The conductor.
    pub size: WireSize,
    /// Reactance in PVC or aluminium conduit, and in steel.
    reactance: [f64; 2],
    /// Resistance of copper in PVC, aluminium, steel.
    copper: [f64; 3],
    /// Resistance of aluminium in PVC, aluminium, steel.
    aluminium: Option<[f64; 3]>,
}

impl ImpedanceRow {
    /// The impedance of `metal` in `conduit`; `None` where the table has none.
    pub fn impedance(&self, metal: Metal, conduit: Conduit) -> Option<Impedance> {
        let [pvc, aluminium, steel] = match metal {
            Metal::Copper => self.copper,
            Metal::Aluminium => self.aluminium?,
        };
        let [x_nonmagnetic, x_steel] = self.reactance;
        let (resistance, reactance) = match conduit {
            Conduit::Pvc => (pvc, x_nonmagnetic),
            Conduit::Aluminium => (aluminium, x_nonmagnetic),
            Conduit::Steel => (steel, x_steel),
        };
        Some(Impedance {
            resistance: ImpedancePerLength::ohms_per_thousand_feet(resistance),
            reactance: ImpedancePerLength::ohms_per_thousand_feet(reactance),
        })
    }
}

/// The row of Table 9 for `size`; it has none for 700, 800 and 900 kcmil nor above 1000.
pub fn impedance_row(size: WireSize) -> Option<ImpedanceRow> {
    IMPEDANCE_ROWS.iter().find(|row| row.size == size).copied()
}

const fn row(size: WireSize, circular_mils: f64, copper: f64, aluminium: f64) -> ConductorRow {
    ConductorRow {
        size,
        area: CrossSection::circular_mils(circular_mils),
        copper,
        aluminium,
    }
}

/// Table 8: size, circular mils, ohms for 1000 ft at 75 °C of uncoated copper and of aluminium, stranded.
#[rustfmt::skip]
#[allow(clippy::approx_constant, reason = "the table prints 3.14 ohms for 14 AWG, which has nothing to do with circles")]
pub static CONDUCTOR_ROWS: [ConductorRow; 26] = [
    row(WireSize::Awg18, 1620.0, 7.95, 13.1),
    row(WireSize::Awg16, 2580.0, 4.99, 8.21),
    row(WireSize::Awg14, 4110.0, 3.14, 5.17),
    row(WireSize::Awg12, 6530.0, 1.98, 3.25),
    row(WireSize::Awg10, 10380.0, 1.24, 2.04),
    row(WireSize::Awg8, 16510.0, 0.778, 1.28),
    row(WireSize::Awg6, 26240.0, 0.491, 0.808),
    row(WireSize::Awg4, 41740.0, 0.308, 0.508),
    row(WireSize::Awg3, 52620.0, 0.245, 0.403),
    row(WireSize::Awg2, 66360.0, 0.194, 0.319),
    row(WireSize::Awg1, 83690.0, 0.154, 0.253),
    row(WireSize::Awg1Over0, 105600.0, 0.122, 0.201),
    row(WireSize::Awg2Over0, 133100.0, 0.0967, 0.159),
    row(WireSize::Awg3Over0, 167800.0, 0.0766, 0.126),
    row(WireSize::Awg4Over0, 211600.0, 0.0608, 0.1),
    row(WireSize::Kcmil250, 250000.0, 0.0515, 0.0847),
    row(WireSize::Kcmil300, 300000.0, 0.0429, 0.0707),
    row(WireSize::Kcmil350, 350000.0, 0.0367, 0.0605),
    row(WireSize::Kcmil400, 400000.0, 0.0321, 0.0529),
    row(WireSize::Kcmil500, 500000.0, 0.0258, 0.0424),
    row(WireSize::Kcmil600, 600000.0, 0.0214, 0.0353),
    row(WireSize::Kcmil700, 700000.0, 0.0184, 0.0303),
    row(WireSize::Kcmil750, 750000.0, 0.0171, 0.0282),
    row(WireSize::Kcmil800, 800000.0, 0.0161, 0.0265),
    row(WireSize::Kcmil900, 900000.0, 0.0143, 0.0235),
    row(WireSize::Kcmil1000, 1000000.0, 0.0129, 0.0212),
];

const fn impedance(
    size: WireSize,
    reactance: [f64; 2],
    copper: [f64; 3],
    aluminium: Option<[f64; 3]>,
) -> ImpedanceRow {
    ImpedanceRow {
        size,
        reactance,
        copper,
        aluminium,
    }
}

/// Table 9: size; reactance in PVC or aluminium, in steel; resistance of copper and of aluminium in PVC, aluminium, steel.
#[rustfmt::skip]
pub static IMPEDANCE_ROWS: [ImpedanceRow; 21] = [
    impedance(WireSize::Awg14, [0.058, 0.073], [3.1, 3.1, 3.1], None),
    impedance(WireSize::Awg12, [0.054, 0.068], [2.0, 2.0, 2.0], Some([3.2, 3.2, 3.2])),
    impedance(WireSize::Awg10, [0.05, 0.063], [1.2, 1.2, 1.2], Some([2.0, 2.0, 2.0])),
    impedance(WireSize::Awg8, [0.052, 0.065], [0.78, 0.78, 0.78], Some([1.3, 1.3, 1.3])),
    impedance(WireSize::Awg6, [0.051, 0.064], [0.49, 0.49, 0.49], Some([0.81, 0.81, 0.81])),
    impedance(WireSize::Awg4, [0.048, 0.06], [0.31, 0.31, 0.31], Some([0.51, 0.51, 0.51])),
    impedance(WireSize::Awg3, [0.047, 0.059], [0.25, 0.25, 0.25], Some([0.4, 0.41, 0.4])),
    impedance(WireSize::Awg2, [0.045, 0.057], [0.19, 0.2, 0.2], Some([0.32, 0.32, 0.32])),
    impedance(WireSize::Awg1, [0.046, 0.057], [0.15, 0.16, 0.16], Some([0.25, 0.26, 0.25])),
    impedance(WireSize::Awg1Over0, [0.044, 0.055], [0.12, 0.13, 0.12], Some([0.2, 0.21, 0.2])),
    impedance(WireSize::Awg2Over0, [0.043, 0.054], [0.1, 0.1, 0.1], Some([0.16, 0.16, 0.16])),
    impedance(WireSize::Awg3Over0, [0.042, 0.052], [0.077, 0.082, 0.079], Some([0.13, 0.13, 0.13])),
    impedance(WireSize::Awg4Over0, [0.041, 0.051], [0.062, 0.067, 0.063], Some([0.1, 0.11, 0.1])),
    impedance(WireSize::Kcmil250, [0.041, 0.052], [0.052, 0.057, 0.054], Some([0.085, 0.09, 0.086])),
    impedance(WireSize::Kcmil300, [0.041, 0.051], [0.044, 0.049, 0.045], Some([0.071, 0.076, 0.072])),
    impedance(WireSize::Kcmil350, [0.04, 0.05], [0.038, 0.043, 0.039], Some([0.061, 0.066, 0.063])),
    impedance(WireSize::Kcmil400, [0.04, 0.049], [0.033, 0.038, 0.035], Some([0.054, 0.059, 0.055])),
    impedance(WireSize::Kcmil500, [0.039, 0.048], [0.027, 0.032, 0.029], Some([0.043, 0.048, 0.045])),
    impedance(WireSize::Kcmil600, [0.039, 0.048], [0.023, 0.028, 0.025], Some([0.036, 0.041, 0.038])),
    impedance(WireSize::Kcmil750, [0.038, 0.048], [0.019, 0.024, 0.021], Some([0.029, 0.034, 0.031])),
    impedance(WireSize::Kcmil1000, [0.037, 0.046], [0.015, 0.019, 0.018], Some([0.023, 0.027, 0.025])),
];
