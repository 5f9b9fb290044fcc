//! The publications by whose authority the rules stand.

use super::Source;

/// National Electrical Code.
pub static NEC: Source = Source {
    name: "NEC",
    edition: "2023",
    title: "NFPA 70, National Electrical Code",
};
/// Industrial control panels.
pub static UL_508A: Source = Source {
    name: "UL 508A",
    edition: "third edition, 2018, revised to 2022",
    title: "Standard for Industrial Control Panels",
};
/// The surface rule for enclosures.
pub static IEC_60890: Source = Source {
    name: "IEC TR 60890",
    edition: "2014",
    title: "Temperature-rise verification of low-voltage switchgear assemblies by calculation",
};
/// The atmosphere.
pub static STANDARD_ATMOSPHERE: Source = Source {
    name: "US Standard Atmosphere",
    edition: "1976",
    title: "U.S. Standard Atmosphere (also ISO 2533)",
};
/// Loss limits of miniature breakers.
pub static IEC_60898_1: Source = Source {
    name: "IEC 60898-1",
    edition: "2015",
    title: "Circuit-breakers for overcurrent protection for household and similar installations",
};
/// Loss limits of fuse links.
pub static IEC_60269_2: Source = Source {
    name: "IEC 60269-2",
    edition: "2013",
    title: "Low-voltage fuses, supplementary requirements for fuses for use by authorized persons",
};
/// Conservation of energy, Ohm's law and their like.
pub static PHYSICS: Source = Source {
    name: "physics",
    edition: "",
    title: "Conservation of energy, the gas law, the circuit laws",
};
/// Rules which the trade uses without one author.
pub static TRADE: Source = Source {
    name: "trade practice",
    edition: "",
    title: "Figures used in the trade, without one author",
};
/// Point-to-point fault currents.
pub static POINT_TO_POINT: Source = Source {
    name: "point-to-point method",
    edition: "",
    title: "Point-to-point method of short-circuit calculation, as published in plan-review handbooks",
};
