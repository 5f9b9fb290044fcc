//! Refusals in words: what is wrong, what would be taken, what to do.

use super::labels::answers;
use super::notes::shortened;
use super::numbers::{Rounding, counted, number, number_not_above, number_not_below};
use super::units::{size, unit_symbol, whole, with_unit};
use crate::entry;
use crate::file::{self, Damage, Expected, Fault};
use crate::quantity::Unit;
use crate::sheet::Impossible;

/// Why a typed text was not taken, and what would be.
pub fn entry_refusal(refusal: &entry::Refusal) -> String {
    use entry::Refusal;
    match refusal {
        Refusal::NotANumber { text } => format!(
            "“{}” is not a number. Type digits; a unit may follow them.",
            shortened(text)
        ),
        Refusal::TwoReadings {
            text,
            readings: [thousands, decimals],
            unit,
        } => format!(
            "“{}” may mean {} or {}. Type it without marks between thousands: {} or {}.",
            shortened(text),
            with_unit(&number(*thousands, Rounding::Exact), *unit),
            with_unit(&number(*decimals, Rounding::Exact), *unit),
            typed_number(*thousands),
            typed_number(*decimals),
        ),
        Refusal::UnknownUnit { unit, fits } => format!(
            "“{}” is no unit known here. Use {}.",
            shortened(unit),
            units(fits)
        ),
        Refusal::WrongUnit { unit, fits } => format!(
            "“{}” measures something else. Use {}.",
            shortened(unit),
            units(fits)
        ),
        Refusal::OutOfRange {
            text,
            least,
            most,
            unit,
        } => format!(
            "“{}” is outside the range. Type a value from {} to {}.",
            shortened(text),
            with_unit(&number_not_below(unit.from_si(*least), *unit), *unit),
            with_unit(&number_not_above(unit.from_si(*most), *unit), *unit),
        ),
        Refusal::NotWhole { text, least, most } => format!(
            "“{}” is not a whole number. Type one from {} to {}.",
            shortened(text),
            whole(*least),
            whole(*most)
        ),
        Refusal::CountOutOfRange { text, least, most } => format!(
            "“{}” is outside the range. Type a whole number from {} to {}.",
            shortened(text),
            whole(*least),
            whole(*most)
        ),
        Refusal::NotOffered { text, offered } => format!(
            "“{}” is none of the answers. Type one of them, or how it begins: {}.",
            shortened(text),
            answers(*offered, "; ")
        ),
        Refusal::SeveralFit { text, fitting } => format!(
            "“{}” may mean {}. Type more of it.",
            shortened(text),
            answers(fitting, ", or ")
        ),
        Refusal::UnknownSize {
            text,
            smaller,
            larger,
        } => {
            let advice = match (smaller, larger) {
                (Some(smaller), Some(larger)) => {
                    format!("Next to it are {} and {}.", size(*smaller), size(*larger))
                }
                (Some(only), None) => format!("The largest is {}.", size(*only)),
                (None, Some(only)) => format!("The smallest is {}.", size(*only)),
                (None, None) => "Type a size such as 4 AWG, 3/0 or 250 kcmil.".to_owned(),
            };
            format!("“{}” is no size of the tables. {advice}", shortened(text))
        }
        Refusal::MetricSize { text, larger } => {
            let advice = match larger {
                Some(larger) => {
                    format!("The smallest with at least this area is {}.", size(*larger))
                }
                None => "They have none so large; enter several conductors in parallel.".to_owned(),
            };
            format!(
                "“{}” is a metric size; the tables of this basis have AWG and kcmil. {advice}",
                shortened(text)
            )
        }
        Refusal::TooLong { length, most } => format!(
            "This is {} characters long, and the field takes {}. Shorten it.",
            counted(*length),
            counted(*most)
        ),
        Refusal::ControlCharacter { text } => format!(
            "“{}” holds a character which cannot be printed, such as a tab or a line end. Take it out.",
            shortened(text)
        ),
    }
}

/// Why a file was not opened, and what can be done.
pub fn file_refusal(refusal: &file::Refusal) -> String {
    use file::Refusal;
    match refusal {
        Refusal::TooLarge { bytes, most } => format!(
            "The file has {} bytes; a sheet has {} at most. It is no sheet of this program.",
            counted(*bytes),
            counted(*most)
        ),
        Refusal::NotJson { line, column } => format!(
            "The file cannot be read as a sheet: something is wrong in line {}, column {}. It may be cut off or changed by another program; open an earlier copy, or mend that line in a text editor.",
            counted(*line),
            counted(*column)
        ),
        Refusal::TooManyValues { most } => format!(
            "The file holds more than the {} values which a sheet may have. It is no sheet of this program.",
            counted(*most)
        ),
        Refusal::NotASheet => {
            "The file can be read, but it is no sheet of this program. Choose a file which was saved here.".to_owned()
        }
        Refusal::NewerFormat { format, newest } => format!(
            "The file was saved by a later version of Ventrail (its format is {format}; this version reads up to {newest}). Open it with that version."
        ),
        Refusal::Damaged(Damage { path, fault }) => format!(
            "The file is a sheet, but something in it is impossible. At {path}: {} Open an earlier copy, or mend that place in a text editor.",
            fault_sentence(fault)
        ),
    }
}

/// What is wrong at a place of a file.
fn fault_sentence(fault: &Fault) -> String {
    match fault {
        Fault::Missing => "something must stand here and does not.".to_owned(),
        Fault::UnknownName => "the format has no such name here.".to_owned(),
        Fault::Repeated => "this stands in the file twice.".to_owned(),
        Fault::WrongType { expected } => format!("{} must stand here.", expected_type(*expected)),
        Fault::UnknownUnit { found } => format!("“{}” is no unit known here.", shortened(found)),
        Fault::WrongUnit { found } => {
            format!("the unit “{}” measures something else.", shortened(found))
        }
        Fault::UnknownChoice { found } => {
            format!("“{}” is no answer known here.", shortened(found))
        }
        Fault::UnknownSize { found } => {
            format!("“{}” is no conductor size known here.", shortened(found))
        }
        Fault::WrongHolder => "this field does not belong here.".to_owned(),
        Fault::TwoHolders => "a feeder and a source of heat are both named.".to_owned(),
        Fault::NoSuchHolder { id } => {
            format!("no feeder and no source of heat has the number {id}.")
        }
        Fault::IdTwice { id } => format!("the number {id} is given to two of them."),
        Fault::IdNotGivenOut { id, next } => {
            format!("the number {id} is not below the next one to be given out, {next}.")
        }
        Fault::TooLargeNumber { most } => format!("the number is above {}.", whole(*most)),
        Fault::TooMany { most } => {
            format!(
                "there are more of them than the {} a sheet may hold.",
                counted(*most)
            )
        }
        Fault::TooLong { most } => {
            format!("the text is longer than {} characters.", counted(*most))
        }
        Fault::Impossible(impossible) => impossible_sentence(impossible),
    }
}

const fn expected_type(expected: Expected) -> &'static str {
    match expected {
        Expected::Text => "a text",
        Expected::Number => "a number",
        Expected::WholeNumber => "a whole number, not negative,",
        Expected::List => "a list",
        Expected::Object => "an object",
    }
}

fn impossible_sentence(impossible: &Impossible) -> String {
    match impossible {
        Impossible::WrongShape => "the field takes a value of another shape or unit.".to_owned(),
        Impossible::NotFinite => "the number is beyond all bounds.".to_owned(),
        Impossible::OutOfRange { least, most } => format!(
            "the value is outside the range of its field, {} to {} in the SI unit.",
            number(*least, Rounding::Exact),
            number(*most, Rounding::Exact)
        ),
        Impossible::TooLong { most } => {
            format!("the text is longer than {} characters.", counted(*most))
        }
        Impossible::Empty => "it is empty.".to_owned(),
        Impossible::NotOffered => "the field does not offer this answer.".to_owned(),
    }
}

/// A number as it may be typed: no marks between thousands.
fn typed_number(value: f64) -> String {
    format!("{value}")
}

fn units(units: &[Unit]) -> String {
    let symbols: Vec<String> = units
        .iter()
        .map(|unit| unit_symbol(*unit).to_owned())
        .collect();
    match symbols.as_slice() {
        [] => "no unit".to_owned(),
        [one] => one.clone(),
        [rest @ .., last] => format!("{} or {last}", rest.join(", ")),
    }
}
