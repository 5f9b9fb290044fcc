//! What became of a row: the core agrees, it does not, or it does not work the topic yet.

use super::keys::{Answers, Inputs, NONE, Value, expected_and_got};
use super::rows::{Expected, Pair, Row};
use super::topics::{Topic, Work, topic_named};
use std::fmt;

/// One compared number.
#[derive(Debug, Clone, PartialEq)]
pub struct Compared {
    /// The expected key.
    pub key: String,
    /// What the row says.
    pub expected: f64,
    /// What the core gave.
    pub got: f64,
    /// The error, in the unit of the key.
    pub error: f64,
    /// The error which would pass.
    pub allowed: f64,
}

impl Compared {
    /// The error as a share of what would pass; above one it fails.
    pub fn of_allowed(&self) -> f64 {
        self.error / self.allowed
    }

    /// The error as a share of the expected value; of nothing, the error itself.
    pub fn of_expected(&self) -> f64 {
        if self.expected.abs() > 0.0 {
            self.error / self.expected.abs()
        } else {
            self.error
        }
    }
}

/// What became of a row.
#[derive(Debug, Clone, PartialEq)]
pub enum Verdict {
    /// Every expected value came out.
    Passed(Vec<Compared>),
    /// Something did not: one line for each trouble.
    Failed(Vec<String>),
    /// The core does not work this topic yet.
    Unsupported(String),
}

/// Puts a row through the core.
pub fn judge(row: &Row) -> Verdict {
    let Some(topic) = topic_named(&row.topic) else {
        return Verdict::Unsupported("no topic has this name".to_owned());
    };
    let Work::Now(work) = topic.work else {
        return Verdict::Unsupported("to be taken up later".to_owned());
    };
    let answers = match Inputs::of(&row.inputs, topic.inputs).and_then(|inputs| work(&inputs)) {
        Ok(answers) => answers,
        Err(trouble) => return Verdict::Failed(vec![trouble]),
    };
    let mut compared = Vec::new();
    let mut troubles = Vec::new();
    for expected in &row.expected {
        if let Err(trouble) = compare(expected, topic, &answers, &mut compared) {
            troubles.push(trouble);
        }
    }
    if troubles.is_empty() {
        Verdict::Passed(compared)
    } else {
        Verdict::Failed(troubles)
    }
}

fn compare(
    expected: &Expected,
    topic: &Topic,
    answers: &Answers,
    compared: &mut Vec<Compared>,
) -> Result<(), String> {
    let Pair { key, value } = &expected.pair;
    let differs = |got: &str| Err(format!("{key}: expected {value}, got {got}"));
    let (wanted, got) = expected_and_got(&expected.pair, topic.expected, answers)?;
    match (wanted, got) {
        (Value::Word(word), None) if word == NONE => Ok(()),
        (_, None) => differs(NONE),
        (Value::Number(wanted), Some(Value::Number(got))) => {
            check_number(expected, wanted, got, compared)
        }
        (Value::Numbers(wanted), Some(Value::Numbers(got))) if wanted.len() == got.len() => wanted
            .into_iter()
            .zip(got)
            .try_for_each(|(wanted, got)| check_number(expected, wanted, got, compared)),
        (wanted, Some(got)) if wanted == got => Ok(()),
        (_, Some(got)) => differs(&got.to_string()),
    }
}

fn check_number(
    expected: &Expected,
    wanted: f64,
    got: f64,
    compared: &mut Vec<Compared>,
) -> Result<(), String> {
    let outcome = Compared {
        key: expected.pair.key.clone(),
        expected: wanted,
        got,
        error: (got - wanted).abs(),
        allowed: expected.tolerance.allowed(wanted),
    };
    // Written so that a number which is none fails: it is not at most anything.
    if outcome.error <= outcome.allowed {
        compared.push(outcome);
        return Ok(());
    }
    Err(format!(
        "{}: expected {wanted}, got {got}, error {} times the tolerance",
        outcome.key,
        outcome.of_allowed()
    ))
}

impl fmt::Display for Value {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        let listed = match self {
            Value::Number(number) => number.to_string(),
            Value::Numbers(numbers) => joined(numbers),
            Value::Word(word) => word.clone(),
            Value::Words(words) => joined(words),
        };
        out.write_str(&listed)
    }
}

fn joined(parts: &[impl ToString]) -> String {
    let parts: Vec<String> = parts.iter().map(ToString::to_string).collect();
    parts.join(",")
}

/// The verdicts on many rows, counted, with the worst error of each topic.
#[derive(Debug, Clone, Default, PartialEq)]
pub struct Tally {
    /// Rows which agree.
    pub passed: usize,
    /// Rows which do not.
    pub failed: usize,
    /// Rows of topics which are not worked yet.
    pub skipped: usize,
    worst: Vec<Worst>,
}

#[derive(Debug, Clone, PartialEq)]
struct Worst {
    topic: String,
    rows: usize,
    row: String,
    compared: Option<Compared>,
}

impl Tally {
    /// Counts the verdict on a row.
    pub fn count(&mut self, row: &Row, verdict: &Verdict) {
        match verdict {
            Verdict::Passed(compared) => {
                self.passed += 1;
                self.note_worst(row, compared);
            }
            Verdict::Failed(_) => self.failed += 1,
            Verdict::Unsupported(_) => self.skipped += 1,
        }
    }

    fn note_worst(&mut self, row: &Row, compared: &[Compared]) {
        let of_row = compared
            .iter()
            .max_by(|a, b| a.of_expected().total_cmp(&b.of_expected()));
        let Some(known) = self.worst.iter_mut().find(|worst| worst.topic == row.topic) else {
            self.worst.push(Worst {
                topic: row.topic.clone(),
                rows: 1,
                row: row.id.clone(),
                compared: of_row.cloned(),
            });
            return;
        };
        known.rows += 1;
        let Some(of_row) = of_row else { return };
        let is_worse = known
            .compared
            .as_ref()
            .is_none_or(|worst| of_row.of_expected() > worst.of_expected());
        if is_worse {
            known.row = row.id.clone();
            known.compared = Some(of_row.clone());
        }
    }

    /// One line for each topic: how many rows agree, and the largest error among them.
    pub fn worst_errors(&self) -> Vec<String> {
        self.worst.iter().map(Worst::to_string).collect()
    }
}

impl fmt::Display for Worst {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(out, "{}: rows {}", self.topic, self.rows)?;
        let Some(compared) = &self.compared else {
            return write!(out, ", nothing but words");
        };
        write!(
            out,
            ", largest error {:.1e} of the value and {:.0} % of its tolerance ({} {}: expected {}, got {})",
            compared.of_expected(),
            100.0 * compared.of_allowed(),
            self.row,
            compared.key,
            compared.expected,
            compared.got
        )
    }
}

impl fmt::Display for Tally {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(
            out,
            "{} passed, {} failed, {} skipped",
            self.passed, self.failed, self.skipped
        )
    }
}

/// Everything about a failing row on as many lines.
pub fn failure_in_full(row: &Row, troubles: &[String]) -> String {
    let listed = |pairs: &[Pair]| {
        let parts: Vec<_> = pairs
            .iter()
            .map(|pair| format!("{}={}", pair.key, pair.value))
            .collect();
        parts.join("; ")
    };
    let expected: Vec<Pair> = row
        .expected
        .iter()
        .map(|expected| expected.pair.clone())
        .collect();
    format!(
        "{} ({}), {}\n  source: {}, {}\n  inputs: {}\n  expected: {}\n  {}",
        row.id,
        row.topic,
        row.ground_text,
        row.source,
        row.place,
        listed(&row.inputs),
        listed(&expected),
        troubles.join("\n  ")
    )
}
