//! The sheet file: a document as text, and back.
//!
//! Here: the saved format in JSON, its names, its limits, and what is wrong with a file which is refused. Reading is
//! strict: whatever the format does not know is refused with its place, because a value passed over in silence would
//! be missing in the sheet. Not here: where files are kept (`browser`), sentences (`words`).
//! Start with [`write()`] and [`read`]; DEVELOPERS.md describes the format.

mod json;
mod names;
mod v1;

pub use names::{choice_name, field_name, size_name, unit_name};

use crate::sheet::{Document, Impossible};
use json::Unread;

/// The number of the format which is written.
pub const FORMAT: u64 = 1;
/// Bytes which a file may have. The largest sheet with every field filled has less than half of it.
pub const LARGEST_FILE: usize = 16 * 1024 * 1024;
/// JSON values which a file may hold: bounds the memory which a hostile file can ask for.
pub const MOST_VALUES: usize = 2_000_000;
/// The largest `next_id`: nobody adds so many rows, and far from the end of the numbers none is given out twice.
pub const LARGEST_NEXT_ID: u32 = 1_000_000_000;
/// Characters which the name of a note's kind may have.
pub const LONGEST_KIND: usize = 64;

/// Stands in every file, so that a stranger's JSON is told apart from a damaged sheet.
const PROGRAM: &str = "ventrail";

/// Why a text was not taken for a sheet.
#[derive(Debug, Clone, PartialEq)]
pub enum Refusal {
    /// Longer than any sheet is.
    TooLarge {
        /// Its bytes.
        bytes: usize,
        /// Bytes a file may have.
        most: usize,
    },
    /// Not well-formed JSON, or something follows the end, or nested deeper than any sheet.
    NotJson {
        /// Line of the trouble, from 1.
        line: usize,
        /// Column in it, from 1.
        column: usize,
    },
    /// More values than any sheet has.
    TooManyValues {
        /// Values a file may hold.
        most: usize,
    },
    /// JSON, but not a sheet of this program.
    NotASheet,
    /// Written by a later version of this program.
    NewerFormat {
        /// The format's number.
        format: u64,
        /// The newest which this version reads.
        newest: u64,
    },
    /// A sheet with something impossible in it.
    Damaged(Damage),
}

/// What is wrong with a sheet, and where.
#[derive(Debug, Clone, PartialEq)]
pub struct Damage {
    /// The place in the file, such as `feeders[3].drive_input.unit`; positions count from 0.
    pub path: String,
    /// What is wrong there.
    pub fault: Fault,
}

/// What is wrong at one place of a file.
#[derive(Debug, Clone, PartialEq)]
pub enum Fault {
    /// Something must stand here.
    Missing,
    /// The format has no such name here.
    UnknownName,
    /// A name, a place or an answer which stood before.
    Repeated,
    /// Another type of value must stand here.
    WrongType {
        /// The type.
        expected: Expected,
    },
    /// No unit has this name.
    UnknownUnit {
        /// What stands there.
        found: String,
    },
    /// A unit of another kind of quantity.
    WrongUnit {
        /// What stands there.
        found: String,
    },
    /// No choice has this name.
    UnknownChoice {
        /// What stands there.
        found: String,
    },
    /// No conductor size has this name.
    UnknownSize {
        /// What stands there.
        found: String,
    },
    /// A field which is known, but not of this holder.
    WrongHolder,
    /// Both a feeder and a source are named.
    TwoHolders,
    /// No such feeder or source is in the file.
    NoSuchHolder {
        /// The identity it should have.
        id: u32,
    },
    /// The identity of two feeders or sources.
    IdTwice {
        /// The identity.
        id: u32,
    },
    /// An identity at or above `next_id`, which would be given out again.
    IdNotGivenOut {
        /// The identity.
        id: u32,
        /// The next one to be given out.
        next: u32,
    },
    /// A whole number which is too large.
    TooLargeNumber {
        /// The largest.
        most: u32,
    },
    /// More of them than a sheet may hold.
    TooMany {
        /// Items it may hold.
        most: usize,
    },
    /// Longer than it may be.
    TooLong {
        /// Characters it may have.
        most: usize,
    },
    /// The field does not take this value.
    Impossible(Impossible),
}

/// A type of JSON value.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Expected {
    /// A text.
    Text,
    /// A number.
    Number,
    /// A whole number, not negative.
    WholeNumber,
    /// A list.
    List,
    /// An object.
    Object,
}

/// The document as the text of a file.
///
/// Equal documents give equal text, and one entry stands on one line, so that two files compare line by line.
pub fn write(document: &Document) -> String {
    v1::write(document)
}

/// The document in the text of a file.
pub fn read(text: &str) -> Result<Document, Refusal> {
    if text.len() > LARGEST_FILE {
        return Err(Refusal::TooLarge {
            bytes: text.len(),
            most: LARGEST_FILE,
        });
    }
    let json = json::parse(text, MOST_VALUES).map_err(|unread| match unread {
        Unread::NotJson { line, column } => Refusal::NotJson { line, column },
        Unread::TooManyValues => Refusal::TooManyValues { most: MOST_VALUES },
    })?;
    if json.at("program").and_then(json::Json::as_text) != Some(PROGRAM) {
        return Err(Refusal::NotASheet);
    }
    let Some(format) = json.at("format").and_then(json::Json::as_whole) else {
        return Err(Refusal::NotASheet);
    };
    // A later format adds its number here, and a function which turns the JSON of the format before into its own.
    match format {
        0 => Err(Refusal::NotASheet),
        FORMAT => v1::read(json).map_err(Refusal::Damaged),
        format => Err(Refusal::NewerFormat {
            format,
            newest: FORMAT,
        }),
    }
}
