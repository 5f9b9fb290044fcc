//! The conditions of the sheet as sentences: fixed text with fields in between, and the grammar of a value among words.
//!
//! Every field of the sheet stands in the title block or in exactly one sentence. Another language may order its sentences
//! as it likes.

use super::entries::{assumed_with_unit, entry_with_unit};
use super::labels::choice;
use super::numbers::{Rounding, number};
use crate::assume::AssumedValue;
use crate::sheet::{Choice, Entry, Shape, UnitSystem, spec};
use crate::working::{Field, Run, RunField};

/// A part of a sentence.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Piece {
    /// Words, with the spaces and the punctuation around them.
    Text(&'static str),
    /// The value of a field.
    Field(Field),
}

use Piece::{Field as Value, Text};

const fn incoming(part: RunField) -> Piece {
    Value(Field::Run(Run::Incoming, part))
}

/// The fields of the title block, in their order.
pub const fn title_block() -> &'static [Field] {
    &[
        Field::SheetName,
        Field::Job,
        Field::Issue,
        Field::IssueDate,
        Field::PreparedBy,
        Field::Basis,
        Field::Edition,
        Field::Units,
        Field::Remark,
    ]
}

/// The supply and the site.
pub fn supply_sentence() -> Vec<Piece> {
    vec![
        Text("Fed at "),
        Value(Field::SupplyVoltage),
        Text(", "),
        Value(Field::SupplyFrequency),
        Text(", from a transformer of "),
        Value(Field::TransformerPower),
        Text(" with "),
        Value(Field::TransformerImpedance),
        Text(" impedance "),
        Value(Field::ImpedanceKind),
        Text("; the fault current at the start of the incoming run is "),
        Value(Field::SourceFaultCurrent),
        Text(". Voltage unbalance at the panel "),
        Value(Field::VoltageUnbalance),
        Text("; "),
        Value(Field::Capacitors),
        Text(" on the bus; "),
        Value(Field::Surges),
        Text(". The site lies "),
        Value(Field::Altitude),
        Text(" above sea level; the air around the enclosure reaches "),
        Value(Field::RoomAmbient),
        Text("."),
    ]
}

/// The incoming run.
pub fn incoming_sentence() -> Vec<Piece> {
    vec![
        Text("The incoming run is "),
        incoming(RunField::Length),
        Text(" long: "),
        incoming(RunField::Sets),
        Text(" "),
        incoming(RunField::Size),
        Text(" in "),
        incoming(RunField::Metal),
        Text(" with "),
        incoming(RunField::Insulation),
        Text(", in "),
        incoming(RunField::Conduit),
        Text(" with "),
        incoming(RunField::Carrying),
        Text(" and air of "),
        incoming(RunField::Ambient),
        Text("; terminals "),
        incoming(RunField::Terminal),
        Text(", power factor "),
        incoming(RunField::PowerFactor),
        Text("."),
    ]
}

/// The main device.
pub fn main_sentence() -> Vec<Piece> {
    vec![
        Text("The main device is "),
        Value(Field::MainType),
        Text(" of "),
        Value(Field::MainRating),
        Text(", with a short-circuit current rating of "),
        Value(Field::MainShortCircuitRating),
        Text("; it loses "),
        Value(Field::MainLoss),
        Text(" at the running current."),
    ]
}

/// The enclosure and its air.
pub fn enclosure_sentence() -> Vec<Piece> {
    vec![
        Text("An enclosure of "),
        Value(Field::EnclosureMaterial),
        Text(", "),
        Value(Field::EnclosureHeight),
        Text(" high, "),
        Value(Field::EnclosureWidth),
        Text(" wide and "),
        Value(Field::EnclosureDepth),
        Text(" deep, stands "),
        Value(Field::Mounting),
        Text(", "),
        Value(Field::Surroundings),
        Text(", "),
        Value(Field::Cooling),
        Text(". The air inside is to stay at or below "),
        Value(Field::InsideLimit),
        Text(". Wall coefficient "),
        Value(Field::WallCoefficient),
        Text("; heat of the sun "),
        Value(Field::SunHeat),
        Text("; airflow of the fans against their filters "),
        Value(Field::InstalledAirflow),
        Text("."),
    ]
}

/// The fields of a sentence, in its order.
pub fn fields(sentence: &[Piece]) -> Vec<Field> {
    sentence
        .iter()
        .filter_map(|piece| match piece {
            Piece::Text(_) => None,
            Piece::Field(field) => Some(*field),
        })
        .collect()
}

/// How the shown `text` of `field`, with its unit, reads within its sentence: `2` sets as `two sets of`.
pub fn in_sentence(field: Field, text: &str) -> String {
    match spec(field).shape {
        Shape::Choice(offered) => offered
            .iter()
            .find(|answer| choice(**answer) == text)
            .map_or_else(
                || text.to_owned(),
                |answer| choice_in_sentence(field, *answer).to_owned(),
            ),
        Shape::Count { .. } => match text.parse() {
            Ok(count) => count_in_sentence(field, count),
            Err(_) => text.to_owned(),
        },
        Shape::Text { .. } | Shape::Measured { .. } | Shape::Choices(_) | Shape::Size => {
            text.to_owned()
        }
    }
}

/// An entered value within a sentence.
pub fn entry_in_sentence(field: Field, entered: &Entry, system: UnitSystem) -> String {
    in_sentence(field, &entry_with_unit(field, entered, system))
}

/// An assumed value within a sentence.
pub fn assumed_in_sentence(field: Field, value: &AssumedValue, system: UnitSystem) -> String {
    in_sentence(field, &assumed_with_unit(field, value, system))
}

fn choice_in_sentence(field: Field, answer: Choice) -> &'static str {
    match (field, answer) {
        (Field::Capacitors, Choice::No) => "no switched power-factor capacitors",
        (Field::Capacitors, Choice::Yes) => "switched power-factor capacitors",
        (Field::Surges, Choice::No) => "no unusual surges",
        (Field::Surges, Choice::Yes) => "prone to surges",
        (Field::ImpedanceKind, Choice::MeasuredImpedance) => "as measured",
        (Field::MainType, Choice::InverseTimeBreaker) => "an inverse time breaker",
        (Field::MainType, Choice::TimeDelayFuse) => "a set of time-delay fuses",
        (Field::MainType, Choice::NontimeDelayFuse) => "a set of nontime-delay fuses",
        (Field::EnclosureMaterial, Choice::Plastic) => "plastic",
        (Field::EnclosureMaterial, Choice::DoubleWalled) => "double-walled sheet",
        (Field::Cooling, Choice::Sealed) => "sealed, so that heat leaves by its walls",
        (Field::Cooling, Choice::FilterFans) => "cooled by filter fans",
        (_, answer) => choice(answer),
    }
}

fn count_in_sentence(field: Field, count: u32) -> String {
    let in_words = count_word(count);
    match (field, count) {
        (Field::Run(_, RunField::Sets), 1) => "one set of".to_owned(),
        (Field::Run(_, RunField::Sets), _) => format!("{in_words} sets of"),
        (Field::Run(_, RunField::Carrying), 1) => "one current-carrying conductor".to_owned(),
        (Field::Run(_, RunField::Carrying), _) => {
            format!("{in_words} current-carrying conductors")
        }
        _ => in_words,
    }
}

/// Small numbers in words, as a sentence has them.
fn count_word(count: u32) -> String {
    const WORDS: [&str; 13] = [
        "no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten",
        "eleven", "twelve",
    ];
    usize::try_from(count)
        .ok()
        .and_then(|position| WORDS.get(position))
        .map_or_else(
            || number(f64::from(count), Rounding::Decimals(0)),
            |word| (*word).to_owned(),
        )
}

/// What stands in a sentence, or in a form, where `field` is neither entered nor assumed.
pub const fn gap(field: Field) -> &'static str {
    match field {
        Field::SourceFaultCurrent => "worked from the transformer",
        Field::MainRating => "the largest rating permitted",
        Field::MainLoss => "as much as the product standards allow",
        Field::WallCoefficient => "by the material",
        Field::SunHeat | Field::InstalledAirflow => "not entered",
        Field::Run(_, RunField::Size) => "the smallest size which fits",
        Field::Run(_, RunField::Length) => "a length not entered",
        Field::TransformerPower => "a power not entered",
        Field::SupplyVoltage => "a voltage not entered",
        Field::EnclosureHeight | Field::EnclosureWidth | Field::EnclosureDepth => {
            "a measure not entered"
        }
        _ => "a value not entered",
    }
}
