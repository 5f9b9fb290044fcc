//! Demo sheets in invented data.

use crate::file;
use crate::sheet::Document;
use crate::words::page;

/// A demo sheet.
pub(super) struct Demo {
    /// What it is.
    pub(super) name: &'static str,
    /// Its file.
    pub(super) text: &'static str,
}

/// Whether a document is a demo sheet as it came.
pub(super) fn is_demo(document: &Document) -> bool {
    DEMOS
        .iter()
        .any(|demo| file::read(demo.text).as_ref() == Ok(document))
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
