//! The wire sizes of North American tables: American Wire Gauge, and circular mils above 4/0.

/// A conductor size, ordered by area.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum WireSize {
    /// 18 AWG.
    Awg18,
    /// 16 AWG.
    Awg16,
    /// 14 AWG.
    Awg14,
    /// 12 AWG.
    Awg12,
    /// 10 AWG.
    Awg10,
    /// 8 AWG.
    Awg8,
    /// 6 AWG.
    Awg6,
    /// 4 AWG.
    Awg4,
    /// 3 AWG.
    Awg3,
    /// 2 AWG.
    Awg2,
    /// 1 AWG.
    Awg1,
    /// 1/0 AWG.
    Awg1Over0,
    /// 2/0 AWG.
    Awg2Over0,
    /// 3/0 AWG.
    Awg3Over0,
    /// 4/0 AWG.
    Awg4Over0,
    /// 250 kcmil.
    Kcmil250,
    /// 300 kcmil.
    Kcmil300,
    /// 350 kcmil.
    Kcmil350,
    /// 400 kcmil.
    Kcmil400,
    /// 500 kcmil.
    Kcmil500,
    /// 600 kcmil.
    Kcmil600,
    /// 700 kcmil.
    Kcmil700,
    /// 750 kcmil.
    Kcmil750,
    /// 800 kcmil.
    Kcmil800,
    /// 900 kcmil.
    Kcmil900,
    /// 1000 kcmil.
    Kcmil1000,
    /// 1250 kcmil.
    Kcmil1250,
    /// 1500 kcmil.
    Kcmil1500,
    /// 1750 kcmil.
    Kcmil1750,
    /// 2000 kcmil.
    Kcmil2000,
}

impl WireSize {
    /// Every size, smallest first.
    pub const ALL: [WireSize; 30] = [
        WireSize::Awg18,
        WireSize::Awg16,
        WireSize::Awg14,
        WireSize::Awg12,
        WireSize::Awg10,
        WireSize::Awg8,
        WireSize::Awg6,
        WireSize::Awg4,
        WireSize::Awg3,
        WireSize::Awg2,
        WireSize::Awg1,
        WireSize::Awg1Over0,
        WireSize::Awg2Over0,
        WireSize::Awg3Over0,
        WireSize::Awg4Over0,
        WireSize::Kcmil250,
        WireSize::Kcmil300,
        WireSize::Kcmil350,
        WireSize::Kcmil400,
        WireSize::Kcmil500,
        WireSize::Kcmil600,
        WireSize::Kcmil700,
        WireSize::Kcmil750,
        WireSize::Kcmil800,
        WireSize::Kcmil900,
        WireSize::Kcmil1000,
        WireSize::Kcmil1250,
        WireSize::Kcmil1500,
        WireSize::Kcmil1750,
        WireSize::Kcmil2000,
    ];

    /// The number by which the size is known: `12`, `1/0`, `250`. Gauge below 250, thousands of circular mils from there.
    pub const fn number(self) -> &'static str {
        match self {
            WireSize::Awg18 => "18",
            WireSize::Awg16 => "16",
            WireSize::Awg14 => "14",
            WireSize::Awg12 => "12",
            WireSize::Awg10 => "10",
            WireSize::Awg8 => "8",
            WireSize::Awg6 => "6",
            WireSize::Awg4 => "4",
            WireSize::Awg3 => "3",
            WireSize::Awg2 => "2",
            WireSize::Awg1 => "1",
            WireSize::Awg1Over0 => "1/0",
            WireSize::Awg2Over0 => "2/0",
            WireSize::Awg3Over0 => "3/0",
            WireSize::Awg4Over0 => "4/0",
            WireSize::Kcmil250 => "250",
            WireSize::Kcmil300 => "300",
            WireSize::Kcmil350 => "350",
            WireSize::Kcmil400 => "400",
            WireSize::Kcmil500 => "500",
            WireSize::Kcmil600 => "600",
            WireSize::Kcmil700 => "700",
            WireSize::Kcmil750 => "750",
            WireSize::Kcmil800 => "800",
            WireSize::Kcmil900 => "900",
            WireSize::Kcmil1000 => "1000",
            WireSize::Kcmil1250 => "1250",
            WireSize::Kcmil1500 => "1500",
            WireSize::Kcmil1750 => "1750",
            WireSize::Kcmil2000 => "2000",
        }
    }

    /// Whether the number is a gauge number, not thousands of circular mils.
    pub fn is_gauge(self) -> bool {
        self < WireSize::Kcmil250
    }

    /// The size with this number.
    pub fn from_number(number: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|size| size.number() == number)
    }

    /// The next smaller size of the scale.
    pub fn next_smaller(self) -> Option<Self> {
        Self::ALL.into_iter().rev().find(|size| *size < self)
    }
}
