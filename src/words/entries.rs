//! Entered and assumed values as text, in the units of the sheet, and why a value is assumed.

use super::labels::{answers, choice, label};
use super::numbers::{Rounding, counted, number, number_not_above, number_not_below};
use super::units::{bare, bare_in, field_unit, size, whole, with_unit};
use crate::assume::{AssumedValue, Assumption};
use crate::entry::read;
use crate::math::agree;
use crate::quantity::Unit;
use crate::sheet::{Entry, Measured, Shape, UnitSystem, spec};
use crate::working::{Amount, Field, Holder, HolderId, Run, RunField};
use std::collections::BTreeMap;

/// What the filled cell of `field` shows, without the unit. A number typed in the unit shown stays as it was typed; any other
/// is converted and rounded.
pub fn entry(field: Field, entered: &Entry, system: UnitSystem) -> String {
    match entered {
        Entry::Text(text) => text.clone(),
        Entry::Measured(measured) => measured_text(field, measured, system),
        Entry::Count(count) => whole(*count),
        Entry::Choice(answer) => choice(*answer).to_owned(),
        Entry::Choices(several) => answers(several, ", "),
        Entry::Size(wire) => size(*wire),
    }
}

/// As [`entry`], with the unit: for sentences and for print.
pub fn entry_with_unit(field: Field, entered: &Entry, system: UnitSystem) -> String {
    let text = entry(field, entered, system);
    match (entered, field_unit(field, system)) {
        (Entry::Measured(_), Some(unit)) => with_unit(&text, unit),
        _ => text,
    }
}

/// The text by which a filled cell opens for editing, or is copied: read again in the units of the sheet it gives the same
/// entry. That is the text as typed; where it had no unit and the units of the sheet have changed since, with its unit.
pub fn entry_to_edit(field: Field, entered: &Entry, system: UnitSystem) -> String {
    let Entry::Measured(measured) = entered else {
        return entry(field, entered, system);
    };
    match read(field, system, &measured.text) {
        Ok(Some(Entry::Measured(again)))
            if again.unit == measured.unit && agree(again.number, measured.number) =>
        {
            measured.text.clone()
        }
        // A plain share can stand in a file, but not be typed.
        _ if measured.unit == Unit::One => {
            let shown = Unit::PerCent;
            with_unit(&shown.from_si(measured.si()).to_string(), shown)
        }
        _ => with_unit(&measured.number.to_string(), measured.unit),
    }
}

/// What the cell of `field` shows where its value is assumed, without the unit.
pub fn assumed(field: Field, value: &AssumedValue, system: UnitSystem) -> String {
    match value {
        AssumedValue::Amount(amount) => amount_of_field(field, *amount, system),
        AssumedValue::Choice(answer) => choice(*answer).to_owned(),
        AssumedValue::Size(wire) => size(*wire),
    }
}

/// As [`assumed`], with the unit.
pub fn assumed_with_unit(field: Field, value: &AssumedValue, system: UnitSystem) -> String {
    let text = assumed(field, value, system);
    match (value, field_unit(field, system)) {
        (AssumedValue::Amount(Amount::Measured { .. }), Some(unit)) => with_unit(&text, unit),
        _ => text,
    }
}

/// One line of the list of assumptions: a value which one or several holders share.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct AssumptionLine {
    /// The field.
    pub label: &'static str,
    /// The value with its unit.
    pub value: String,
    /// Why it is so.
    pub reason: &'static str,
    /// The tags of the feeders or sources it was assumed for; empty for the sheet itself.
    pub holders: Vec<String>,
}

/// Everything assumed, each field with each of its values once, in the order of the fields. `tag` gives the name of a
/// feeder or of a source of heat.
pub fn assumption_lines(
    assumptions: &[Assumption],
    system: UnitSystem,
    tag: impl Fn(HolderId) -> String,
) -> Vec<AssumptionLine> {
    let mut lines: BTreeMap<(Field, String), Vec<String>> = BTreeMap::new();
    for assumption in assumptions {
        let field = assumption.place.field;
        let value = assumed_with_unit(field, &assumption.value, system);
        let holders = lines.entry((field, value)).or_default();
        match assumption.place.holder {
            Holder::Sheet => {}
            Holder::Feeder(id) | Holder::Source(id) => holders.push(tag(id)),
        }
    }
    lines
        .into_iter()
        .map(|((field, value), holders)| AssumptionLine {
            label: label(field),
            value,
            reason: assumption_reason(field),
            holders,
        })
        .collect()
}

/// An amount in the unit of `field`, without the unit.
pub fn amount_of_field(field: Field, amount: Amount, system: UnitSystem) -> String {
    match (amount, field_unit(field, system)) {
        (Amount::Measured { si, kind }, Some(unit)) if unit.measures(kind) => bare_in(si, unit),
        _ => bare(amount, system),
    }
}

/// An amount in the unit of `field`, with the unit.
pub fn amount_of_field_with_unit(field: Field, amount: Amount, system: UnitSystem) -> String {
    match (amount, field_unit(field, system)) {
        (Amount::Measured { si, kind }, Some(unit)) if unit.measures(kind) => {
            with_unit(&bare_in(si, unit), unit)
        }
        _ => super::units::amount(amount, system),
    }
}

fn measured_text(field: Field, measured: &Measured, system: UnitSystem) -> String {
    let Some(unit) = field_unit(field, system) else {
        return measured.text.clone();
    };
    if measured.unit != unit {
        return bare_in(measured.si(), unit);
    }
    let typed = measured.text.trim();
    if is_plain_number(typed) {
        typed.to_owned()
    } else {
        number(measured.number, Rounding::Exact)
    }
}

/// Whether `text` is digits with at most one decimal point between them.
fn is_plain_number(text: &str) -> bool {
    let (whole, decimals) = text.split_once('.').unwrap_or((text, "0"));
    [whole, decimals]
        .iter()
        .all(|part| !part.is_empty() && part.bytes().all(|digit| digit.is_ascii_digit()))
}

/// What `field` takes, in the units of the sheet: `100 V to 1,000 V`.
pub fn accepted(field: Field, system: UnitSystem) -> String {
    match spec(field).shape {
        Shape::Text { longest } => format!("a text of up to {} characters", counted(longest)),
        Shape::Measured { least, most, .. } => {
            let unit = spec(field).unit(system);
            format!(
                "{} to {}",
                with_unit(&number_not_below(unit.from_si(least), unit), unit),
                with_unit(&number_not_above(unit.from_si(most), unit), unit)
            )
        }
        Shape::Count { least, most } => {
            format!("a whole number, {} to {}", whole(least), whole(most))
        }
        Shape::Choice(offered) => format!("one of: {}", answers(offered, ", ")),
        Shape::Choices(offered) => format!("any of: {}", answers(offered, ", ")),
        Shape::Size => "a conductor size such as 4 AWG, 3/0 or 250 kcmil".to_owned(),
    }
}

/// Why the value of `field` is assumed as it is: a clause to stand behind it.
pub const fn assumption_reason(field: Field) -> &'static str {
    match field {
        Field::Basis | Field::Edition => "the rules this program works by",
        Field::Units => "the usual units of the basis",
        Field::SupplyFrequency => "the frequency of North American supplies",
        Field::TransformerImpedance => "a common nameplate value; the transformer's own decides",
        Field::ImpedanceKind => "the more cautious: a tolerance is allowed for",
        Field::VoltageUnbalance => "a usual value for a supply nobody has measured",
        Field::Capacitors => "none have been named",
        Field::Surges => "none have been named",
        Field::Altitude => "sea level until the site is known",
        Field::RoomAmbient => "the usual design value for plant rooms",
        Field::MainType => "the usual main of a panel",
        Field::EnclosureMaterial => "the usual enclosure",
        Field::Mounting => "no wall or neighbour has been named",
        Field::Surroundings => "no sun or weather has been named",
        Field::Cooling => "no fans have been named",
        Field::InsideLimit => "the usual limit for drives and control gear inside",
        Field::Running | Field::SourceRunning => {
            "the more cautious: it adds to the load and the heat"
        }
        Field::MotorCurrent => "from the table of motor currents",
        Field::DriveInput => {
            "from the next motor of the table with usual efficiencies; the drive's data sheet decides"
        }
        Field::DriveLoss => "3 % of motor power and 30 W for its control",
        Field::HeatsinkShare => "no heatsink through the wall has been named",
        Field::DriveChoke => "no choke has been named",
        Field::DriveAmbientLimit => "the usual limit of drives at full current",
        Field::DriveAltitudeLimit => "the usual limit of drives at full current",
        Field::DeviceType => {
            "the first type which the drive's instructions permit, a time-delay fuse where they name none"
        }
        Field::DeviceLoss | Field::MainLoss => {
            "the limit of the product standards, by the square of the current"
        }
        Field::ReactorReference => "the usual base of a reactor's percentage",
        Field::ReactorLoss => "0.5 % of motor power",
        Field::SourceEfficiency => "a usual value for control supplies",
        Field::Run(which, part) => match part {
            RunField::Place => "the usual place of such a run",
            RunField::Length => "a usual length within an enclosure",
            RunField::Metal => "the usual metal",
            RunField::Sets => "one conductor for each phase",
            RunField::Ambient => "as warm as the air around the enclosure",
            RunField::Carrying => "the three phases alone",
            RunField::Insulation => "the usual insulation of such a run",
            RunField::Terminal => "the more cautious: no mark has been named",
            RunField::Conduit if matches!(which, Run::Incoming) => {
                "the more cautious for the fault current"
            }
            RunField::Conduit => "the usual raceway, and the more cautious for the voltage drop",
            RunField::PowerFactor => "a usual value at full load",
            RunField::Size => "the smallest size which fits",
        },
        Field::SheetName
        | Field::Job
        | Field::Issue
        | Field::PreparedBy
        | Field::IssueDate
        | Field::Remark
        | Field::SupplyVoltage
        | Field::SourceFaultCurrent
        | Field::TransformerPower
        | Field::MainRating
        | Field::MainShortCircuitRating
        | Field::EnclosureHeight
        | Field::EnclosureWidth
        | Field::EnclosureDepth
        | Field::WallCoefficient
        | Field::SunHeat
        | Field::InstalledAirflow
        | Field::Tag
        | Field::Load
        | Field::MotorPower
        | Field::PermittedTypes
        | Field::LargestPermitted
        | Field::ShortCircuitRating
        | Field::DeviceRating
        | Field::ReactorPercent
        | Field::ReactorReferenceCurrent
        | Field::FeederRemark
        | Field::SourceName
        | Field::SourceHeat
        | Field::SourceOutput
        | Field::SourceCurrent => "filled in until it is typed",
    }
}
