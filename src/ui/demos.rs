//! Demo sheets in invented data.

use crate::words::page;

/// A demo sheet.
pub(super) struct Demo {
    /// What it is.
    pub(super) name: &'static str,
    /// Its file.
    pub(super) text: &'static str,
}

/// The demo sheets.
pub(super) static DEMOS: [Demo; 2] = [
    Demo {
        name: page::demo_brine_hall(),
        text: include_str!("../../examples/brine-hall.json"),
    },
    Demo {
        name: page::demo_outdoor(),
        text: include_str!("../../examples/high-sealed.json"),
    },
];
