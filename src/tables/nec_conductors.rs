//! NEC 2023, conductors: Table 310.16 (ampacity), Table 310.15(B)(1)(1) (ambient), Table 310.15(C)(1) (count),
//! Table 250.122 (equipment grounding conductor).

use super::{Column, Known, Metal};
use crate::math::reaches;
use crate::quantity::{Current, Ratio, Temperature, WireSize};

/// A row of an ampacity table: copper at 60, 75, 90 °C, aluminium at 60, 75, 90 °C, amperes.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct AmpacityRow {
    /// The conductor.
    pub size: WireSize,
    amperes: [Option<f64>; 6],
    /// How the row is known.
    pub known: Known,
}

impl AmpacityRow {
    /// The ampacity of this conductor in `metal` and `column`; `None` where the table has none.
    pub fn ampacity(&self, metal: Metal, column: Column) -> Option<Current> {
        let [cu_60, cu_75, cu_90, al_60, al_75, al_90] = self.amperes;
        match (metal, column) {
            (Metal::Copper, Column::C60) => cu_60,
            (Metal::Copper, Column::C75) => cu_75,
            (Metal::Copper, Column::C90) => cu_90,
            (Metal::Aluminium, Column::C60) => al_60,
            (Metal::Aluminium, Column::C75) => al_75,
            (Metal::Aluminium, Column::C90) => al_90,
        }
        .map(Current::amperes)
    }
}

/// The row of Table 310.16 for `size`.
pub fn ampacity_row(size: WireSize) -> Option<AmpacityRow> {
    AMPACITY_ROWS.iter().find(|row| row.size == size).copied()
}

/// The ambient factor of the band in which `ambient` lies, on the base of 30 °C; between two bands the hotter one.
/// `None` above the last band of the column: the insulation must not be used there.
pub fn ambient_factor(ambient: Temperature, column: Column) -> Option<Ratio> {
    let band = AMBIENT_BANDS
        .iter()
        .find(|band| reaches(band.up_to_celsius, ambient.to_celsius()))?;
    let [c60, c75, c90] = band.factors;
    match column {
        Column::C60 => c60,
        Column::C75 => c75,
        Column::C90 => c90,
    }
    .map(Ratio::of_one)
}

/// The factor for `carrying` current-carrying conductors in one raceway or bundle.
pub fn count_factor(carrying: u32) -> Ratio {
    COUNT_BANDS
        .iter()
        .find(|band| band.up_to.is_none_or(|most| carrying <= most))
        .map_or(Ratio::per_cent(LEAST_COUNT_PER_CENT), |band| {
            Ratio::per_cent(band.per_cent)
        })
}

/// The grounding conductor of the first row of Table 250.122 not below `device`.
pub fn grounding_conductor(device: Current, metal: Metal) -> Option<WireSize> {
    GROUNDING_ROWS
        .iter()
        .find(|row| reaches(row.device.to_amperes(), device.to_amperes()))
        .copied()
        .map(|row| match metal {
            Metal::Copper => row.copper,
            Metal::Aluminium => row.aluminium,
        })
}

const fn row(size: WireSize, amperes: [Option<f64>; 6], known: Known) -> AmpacityRow {
    AmpacityRow {
        size,
        amperes,
        known,
    }
}

/// Table 310.16: 30 °C ambient, not more than three current-carrying conductors.
#[rustfmt::skip]
pub static AMPACITY_ROWS: [AmpacityRow; 30] = [
    row(WireSize::Awg18, [None, None, Some(14.0), None, None, None], Known::CrossChecked),
    row(WireSize::Awg16, [None, None, Some(18.0), None, None, None], Known::CrossChecked),
    row(WireSize::Awg14, [Some(15.0), Some(20.0), Some(25.0), None, None, None], Known::CrossChecked),
    row(WireSize::Awg12, [Some(20.0), Some(25.0), Some(30.0), Some(15.0), Some(20.0), Some(25.0)], Known::CrossChecked),
    row(WireSize::Awg10, [Some(30.0), Some(35.0), Some(40.0), Some(25.0), Some(30.0), Some(35.0)], Known::CrossChecked),
    row(WireSize::Awg8, [Some(40.0), Some(50.0), Some(55.0), Some(35.0), Some(40.0), Some(45.0)], Known::CrossChecked),
    row(WireSize::Awg6, [Some(55.0), Some(65.0), Some(75.0), Some(40.0), Some(50.0), Some(55.0)], Known::CrossChecked),
    row(WireSize::Awg4, [Some(70.0), Some(85.0), Some(95.0), Some(55.0), Some(65.0), Some(75.0)], Known::CrossChecked),
    row(WireSize::Awg3, [Some(85.0), Some(100.0), Some(115.0), Some(65.0), Some(75.0), Some(85.0)], Known::CrossChecked),
    row(WireSize::Awg2, [Some(95.0), Some(115.0), Some(130.0), Some(75.0), Some(90.0), Some(100.0)], Known::CrossChecked),
    row(WireSize::Awg1, [Some(110.0), Some(130.0), Some(145.0), Some(85.0), Some(100.0), Some(115.0)], Known::CrossChecked),
    row(WireSize::Awg1Over0, [Some(125.0), Some(150.0), Some(170.0), Some(100.0), Some(120.0), Some(135.0)], Known::CrossChecked),
    row(WireSize::Awg2Over0, [Some(145.0), Some(175.0), Some(195.0), Some(115.0), Some(135.0), Some(150.0)], Known::CrossChecked),
    row(WireSize::Awg3Over0, [Some(165.0), Some(200.0), Some(225.0), Some(130.0), Some(155.0), Some(175.0)], Known::CrossChecked),
    row(WireSize::Awg4Over0, [Some(195.0), Some(230.0), Some(260.0), Some(150.0), Some(180.0), Some(205.0)], Known::CrossChecked),
    row(WireSize::Kcmil250, [Some(215.0), Some(255.0), Some(290.0), Some(170.0), Some(205.0), Some(230.0)], Known::CrossChecked),
    row(WireSize::Kcmil300, [Some(240.0), Some(285.0), Some(320.0), Some(195.0), Some(230.0), Some(260.0)], Known::CrossChecked),
    row(WireSize::Kcmil350, [Some(260.0), Some(310.0), Some(350.0), Some(210.0), Some(250.0), Some(280.0)], Known::CrossChecked),
    row(WireSize::Kcmil400, [Some(280.0), Some(335.0), Some(380.0), Some(225.0), Some(270.0), Some(305.0)], Known::CrossChecked),
    row(WireSize::Kcmil500, [Some(320.0), Some(380.0), Some(430.0), Some(260.0), Some(310.0), Some(350.0)], Known::CrossChecked),
    row(WireSize::Kcmil600, [Some(350.0), Some(420.0), Some(475.0), Some(285.0), Some(340.0), Some(385.0)], Known::CrossChecked),
    row(WireSize::Kcmil700, [Some(385.0), Some(460.0), Some(520.0), Some(315.0), Some(375.0), Some(425.0)], Known::CrossChecked),
    row(WireSize::Kcmil750, [Some(400.0), Some(475.0), Some(535.0), Some(320.0), Some(385.0), Some(435.0)], Known::CrossChecked),
    row(WireSize::Kcmil800, [Some(410.0), Some(490.0), Some(555.0), Some(330.0), Some(395.0), Some(445.0)], Known::CrossChecked),
    row(WireSize::Kcmil900, [Some(435.0), Some(520.0), Some(585.0), Some(355.0), Some(425.0), Some(480.0)], Known::CrossChecked),
    row(WireSize::Kcmil1000, [Some(455.0), Some(545.0), Some(615.0), Some(375.0), Some(445.0), Some(500.0)], Known::CrossChecked),
    row(WireSize::Kcmil1250, [Some(495.0), Some(590.0), Some(665.0), Some(405.0), Some(485.0), Some(545.0)], Known::CrossChecked),
    row(WireSize::Kcmil1500, [Some(525.0), Some(625.0), Some(705.0), Some(435.0), Some(520.0), Some(585.0)], Known::FromMemory),
    row(WireSize::Kcmil1750, [Some(545.0), Some(650.0), Some(735.0), Some(455.0), Some(545.0), Some(615.0)], Known::CrossChecked),
    row(WireSize::Kcmil2000, [Some(555.0), Some(665.0), Some(750.0), Some(470.0), Some(560.0), Some(630.0)], Known::FromMemory),
];

/// A band of Table 310.15(B)(1)(1).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct AmbientBand {
    /// Upper edge of the band, degrees Celsius.
    pub up_to_celsius: f64,
    /// Factors for 60, 75 and 90 °C insulation.
    pub factors: [Option<f64>; 3],
}

/// Table 310.15(B)(1)(1), ambient other than 30 °C.
#[rustfmt::skip]
pub static AMBIENT_BANDS: [AmbientBand; 16] = [
    AmbientBand { up_to_celsius: 10.0, factors: [Some(1.29), Some(1.2), Some(1.15)] },
    AmbientBand { up_to_celsius: 15.0, factors: [Some(1.22), Some(1.15), Some(1.12)] },
    AmbientBand { up_to_celsius: 20.0, factors: [Some(1.15), Some(1.11), Some(1.08)] },
    AmbientBand { up_to_celsius: 25.0, factors: [Some(1.08), Some(1.05), Some(1.04)] },
    AmbientBand { up_to_celsius: 30.0, factors: [Some(1.0), Some(1.0), Some(1.0)] },
    AmbientBand { up_to_celsius: 35.0, factors: [Some(0.91), Some(0.94), Some(0.96)] },
    AmbientBand { up_to_celsius: 40.0, factors: [Some(0.82), Some(0.88), Some(0.91)] },
    AmbientBand { up_to_celsius: 45.0, factors: [Some(0.71), Some(0.82), Some(0.87)] },
    AmbientBand { up_to_celsius: 50.0, factors: [Some(0.58), Some(0.75), Some(0.82)] },
    AmbientBand { up_to_celsius: 55.0, factors: [Some(0.41), Some(0.67), Some(0.76)] },
    AmbientBand { up_to_celsius: 60.0, factors: [None, Some(0.58), Some(0.71)] },
    AmbientBand { up_to_celsius: 65.0, factors: [None, Some(0.47), Some(0.65)] },
    AmbientBand { up_to_celsius: 70.0, factors: [None, Some(0.33), Some(0.58)] },
    AmbientBand { up_to_celsius: 75.0, factors: [None, None, Some(0.5)] },
    AmbientBand { up_to_celsius: 80.0, factors: [None, None, Some(0.41)] },
    AmbientBand { up_to_celsius: 85.0, factors: [None, None, Some(0.29)] },
];

/// A band of Table 310.15(C)(1).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct CountBand {
    /// Most conductors of the band; `None` for the last.
    pub up_to: Option<u32>,
    /// Per cent of the table's ampacity.
    pub per_cent: f64,
}

const LEAST_COUNT_PER_CENT: f64 = 35.0;

/// Table 310.15(C)(1), more than three current-carrying conductors.
#[rustfmt::skip]
pub static COUNT_BANDS: [CountBand; 7] = [
    CountBand { up_to: Some(3), per_cent: 100.0 },
    CountBand { up_to: Some(6), per_cent: 80.0 },
    CountBand { up_to: Some(9), per_cent: 70.0 },
    CountBand { up_to: Some(20), per_cent: 50.0 },
    CountBand { up_to: Some(30), per_cent: 45.0 },
    CountBand { up_to: Some(40), per_cent: 40.0 },
    CountBand { up_to: None, per_cent: LEAST_COUNT_PER_CENT },
];

/// A row of Table 250.122.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct GroundingRow {
    /// Largest rating of the device ahead.
    pub device: Current,
    /// Copper conductor.
    pub copper: WireSize,
    /// Aluminium conductor.
    pub aluminium: WireSize,
}

/// Table 250.122, smallest equipment grounding conductors.
#[rustfmt::skip]
pub static GROUNDING_ROWS: [GroundingRow; 19] = [
    GroundingRow { device: Current::amperes(15.0), copper: WireSize::Awg14, aluminium: WireSize::Awg12 },
    GroundingRow { device: Current::amperes(20.0), copper: WireSize::Awg12, aluminium: WireSize::Awg10 },
    GroundingRow { device: Current::amperes(60.0), copper: WireSize::Awg10, aluminium: WireSize::Awg8 },
    GroundingRow { device: Current::amperes(100.0), copper: WireSize::Awg8, aluminium: WireSize::Awg6 },
    GroundingRow { device: Current::amperes(200.0), copper: WireSize::Awg6, aluminium: WireSize::Awg4 },
    GroundingRow { device: Current::amperes(300.0), copper: WireSize::Awg4, aluminium: WireSize::Awg2 },
    GroundingRow { device: Current::amperes(400.0), copper: WireSize::Awg3, aluminium: WireSize::Awg1 },
    GroundingRow { device: Current::amperes(500.0), copper: WireSize::Awg2, aluminium: WireSize::Awg1Over0 },
    GroundingRow { device: Current::amperes(600.0), copper: WireSize::Awg1, aluminium: WireSize::Awg2Over0 },
    GroundingRow { device: Current::amperes(800.0), copper: WireSize::Awg1Over0, aluminium: WireSize::Awg3Over0 },
    GroundingRow { device: Current::amperes(1000.0), copper: WireSize::Awg2Over0, aluminium: WireSize::Awg4Over0 },
    GroundingRow { device: Current::amperes(1200.0), copper: WireSize::Awg3Over0, aluminium: WireSize::Kcmil250 },
    GroundingRow { device: Current::amperes(1600.0), copper: WireSize::Awg4Over0, aluminium: WireSize::Kcmil350 },
    GroundingRow { device: Current::amperes(2000.0), copper: WireSize::Kcmil250, aluminium: WireSize::Kcmil400 },
    GroundingRow { device: Current::amperes(2500.0), copper: WireSize::Kcmil350, aluminium: WireSize::Kcmil600 },
    GroundingRow { device: Current::amperes(3000.0), copper: WireSize::Kcmil400, aluminium: WireSize::Kcmil600 },
    GroundingRow { device: Current::amperes(4000.0), copper: WireSize::Kcmil500, aluminium: WireSize::Kcmil750 },
    GroundingRow { device: Current::amperes(5000.0), copper: WireSize::Kcmil700, aluminium: WireSize::Kcmil1250 },
    GroundingRow { device: Current::amperes(6000.0), copper: WireSize::Kcmil800, aluminium: WireSize::Kcmil1250 },
];
