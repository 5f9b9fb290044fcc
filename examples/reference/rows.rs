//! The rows of a file: what each column may hold, and what makes a file unreadable.

use std::collections::BTreeSet;
use std::fmt;

/// The columns of every file, in their order.
pub const COLUMNS: [&str; 9] = [
    "id",
    "topic",
    "inputs",
    "expected",
    "tolerance",
    "ground",
    "source",
    "place",
    "note",
];

/// On what an expected value rests.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Ground {
    /// Printed in a publication.
    Published,
    /// Worked by hand from its recipe in the note.
    Derived,
    /// Computed with a library which is named.
    Computed,
    /// A fact of the trade without a source.
    CommonPractice,
    /// Recalled; no page could be read.
    FromMemory,
}

impl Ground {
    fn from_text(text: &str) -> Option<Self> {
        match text {
            "published" => Some(Ground::Published),
            "derived" => Some(Ground::Derived),
            "common practice" => Some(Ground::CommonPractice),
            "from memory" => Some(Ground::FromMemory),
            _ => text
                .strip_prefix("computed with ")
                .filter(|library| library.contains(|part: char| part.is_ascii_digit()))
                .map(|_| Ground::Computed),
        }
    }

    /// Whether a row of this ground must name its source and the place in it.
    fn needs_source(self) -> bool {
        matches!(self, Ground::Published | Ground::Computed)
    }
}

/// How far a value may lie from the expected one.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Tolerance {
    /// Not at all, but for the last bits of the arithmetic.
    Exact,
    /// By a share of the expected value.
    Relative(f64),
    /// By an amount in the unit of the expected value.
    Absolute(f64),
}

/// What `exact` allows, as a share: the rounding of binary arithmetic.
pub const EXACT_SHARE: f64 = 1e-9;

impl Tolerance {
    /// The largest error which passes.
    pub fn allowed(self, expected: f64) -> f64 {
        match self {
            Tolerance::Exact => EXACT_SHARE * expected.abs(),
            Tolerance::Relative(share) => share * expected.abs(),
            Tolerance::Absolute(amount) => amount,
        }
    }

    fn from_text(text: &str) -> Option<Self> {
        if text == "exact" {
            return Some(Tolerance::Exact);
        }
        let (name, number) = text.split_once('=')?;
        let number: f64 = number.parse().ok()?;
        // A relative tolerance of the whole value would pass nothing as something: such a check could not fail.
        match name {
            "rel" if number > 0.0 && number < 1.0 => Some(Tolerance::Relative(number)),
            "abs" if number > 0.0 && number.is_finite() => Some(Tolerance::Absolute(number)),
            _ => None,
        }
    }
}

/// A `key=value` pair.
#[derive(Debug, Clone, PartialEq)]
pub struct Pair {
    /// Name of the quantity with its unit.
    pub key: String,
    /// The value as written.
    pub value: String,
}

/// One expected value with its tolerance.
#[derive(Debug, Clone, PartialEq)]
pub struct Expected {
    /// Key and value.
    pub pair: Pair,
    /// How far the core may be off.
    pub tolerance: Tolerance,
}

/// One row.
#[derive(Debug, Clone, PartialEq)]
pub struct Row {
    /// Its name, unique in the file.
    pub id: String,
    /// Its topic.
    pub topic: String,
    /// What is put in.
    pub inputs: Vec<Pair>,
    /// What must come out; not empty.
    pub expected: Vec<Expected>,
    /// On what it rests.
    pub ground: Ground,
    /// The ground as written.
    pub ground_text: String,
    /// The publication or library.
    pub source: String,
    /// Page, table, clause, function.
    pub place: String,
    /// What is to be known about it.
    pub note: String,
}

/// Why a file cannot be read, and in which row.
#[derive(Debug, Clone, PartialEq)]
pub struct Unreadable {
    /// Id of the row, or what stands for it.
    pub row: String,
    /// What is wrong.
    pub why: String,
}

impl fmt::Display for Unreadable {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(out, "row {}: {}", self.row, self.why)
    }
}

/// The rows in the text of a file.
pub fn read(text: &str) -> Result<Vec<Row>, Unreadable> {
    let in_head = |why: String| Unreadable {
        row: "of the heads".to_owned(),
        why,
    };
    let mut reader = csv::Reader::from_reader(text.as_bytes());
    let heads = reader
        .headers()
        .map_err(|error| in_head(error.to_string()))?;
    if heads.iter().ne(COLUMNS) {
        return Err(in_head(format!(
            "the columns must be {}",
            COLUMNS.join(", ")
        )));
    }
    let mut ids = BTreeSet::new();
    let mut rows = Vec::new();
    for (position, record) in reader.records().enumerate() {
        let record = record.map_err(|error| Unreadable {
            row: format!("{}", position + 1),
            why: error.to_string(),
        })?;
        let cell = |column: usize| record.get(column).unwrap_or_default().trim();
        let row = row_of(&cell).map_err(|why| Unreadable {
            row: cell(0).to_owned(),
            why,
        })?;
        if !ids.insert(row.id.clone()) {
            return Err(Unreadable {
                row: row.id,
                why: "another row has this id".to_owned(),
            });
        }
        rows.push(row);
    }
    Ok(rows)
}

fn row_of<'a>(cell: &impl Fn(usize) -> &'a str) -> Result<Row, String> {
    let [
        id,
        topic,
        inputs,
        expected,
        tolerance,
        ground_text,
        source,
        place,
        note,
    ] = core::array::from_fn(cell);
    if id.is_empty() || topic.is_empty() {
        return Err("id and topic must stand in every row".to_owned());
    }
    let Some(ground) = Ground::from_text(ground_text) else {
        return Err(format!(
            "the ground `{ground_text}` is none of published, derived, computed with <library version>, common \
             practice, from memory"
        ));
    };
    if ground.needs_source() && (source.is_empty() || place.is_empty()) {
        return Err(format!(
            "a row which is {ground_text} must name source and place"
        ));
    }
    if ground == Ground::Derived && note.is_empty() {
        return Err("a derived row must give its recipe in the note".to_owned());
    }
    let expected = with_tolerances(pairs(expected)?, tolerance)?;
    if expected.is_empty() {
        return Err("nothing is expected: such a check could not fail".to_owned());
    }
    Ok(Row {
        id: id.to_owned(),
        topic: topic.to_owned(),
        inputs: pairs(inputs)?,
        expected,
        ground,
        ground_text: ground_text.to_owned(),
        source: source.to_owned(),
        place: place.to_owned(),
        note: note.to_owned(),
    })
}

/// The pairs of a list `key=value;…`.
fn pairs(text: &str) -> Result<Vec<Pair>, String> {
    let mut keys = BTreeSet::new();
    let mut pairs = Vec::new();
    for part in parts(text) {
        let Some((key, value)) = part.split_once('=') else {
            return Err(format!("`{part}` is no key=value"));
        };
        let (key, value) = (key.trim().to_owned(), value.trim().to_owned());
        if key.is_empty() || value.is_empty() {
            return Err(format!("`{part}` lacks key or value"));
        }
        if !keys.insert(key.clone()) {
            return Err(format!("the key {key} stands twice"));
        }
        pairs.push(Pair { key, value });
    }
    Ok(pairs)
}

fn parts(text: &str) -> impl Iterator<Item = &str> {
    text.split(';')
        .map(str::trim)
        .filter(|part| !part.is_empty())
}

/// One tolerance for all, or `key tolerance` for each; a key may leave out its unit.
fn with_tolerances(pairs: Vec<Pair>, text: &str) -> Result<Vec<Expected>, String> {
    let wrong = |part: &str| format!("`{part}` is no tolerance: exact, rel=… below 1, abs=…");
    let mut common = None;
    let mut special: Vec<(&str, Tolerance)> = Vec::new();
    for part in parts(text) {
        match part.split_once(' ') {
            Some((name, tolerance)) => {
                let tolerance =
                    Tolerance::from_text(tolerance.trim()).ok_or_else(|| wrong(part))?;
                if !pairs.iter().any(|pair| is_named(&pair.key, name)) {
                    return Err(format!(
                        "a tolerance is given for {name}, which is not expected"
                    ));
                }
                special.push((name, tolerance));
            }
            None if common.is_none() => {
                common = Some(Tolerance::from_text(part).ok_or_else(|| wrong(part))?);
            }
            None => return Err("two tolerances stand for all values".to_owned()),
        }
    }
    pairs
        .into_iter()
        .map(|pair| {
            let own = special
                .iter()
                .find(|(name, _)| is_named(&pair.key, name))
                .map(|(_, tolerance)| *tolerance);
            match own.or(common) {
                Some(tolerance) => can_fail(Expected { pair, tolerance }),
                None => Err(format!("{} has no tolerance", pair.key)),
            }
        })
        .collect()
}

fn is_named(key: &str, name: &str) -> bool {
    key.strip_prefix(name)
        .is_some_and(|rest| rest.is_empty() || rest.starts_with('_'))
}

/// A tolerance as large as the value itself would let nothing pass for it.
fn can_fail(expected: Expected) -> Result<Expected, String> {
    let is_hollow = match (expected.tolerance, expected.pair.value.parse::<f64>()) {
        (Tolerance::Absolute(amount), Ok(value)) => value.abs() <= amount,
        _ => false,
    };
    if is_hollow {
        return Err(format!(
            "the tolerance of {} is as large as the value",
            expected.pair.key
        ));
    }
    Ok(expected)
}
