//! A feeder with its gaps filled, and a run of any holder.

use super::Assumption;
use super::reader::{Reader, column, conduit, device, mapped, metal};
use super::site::Site;
use crate::quantity::{Current, Length, Power, Ratio, ShaftPower, Temperature};
use crate::sheet::{Choice, Item};
use crate::sizing::conductor::{RunInput, Surrounding, Terminal};
use crate::sizing::reactor::Reference;
use crate::tables::DeviceType;
use crate::working::{Field, Given, Holder, Run, RunField};
use std::collections::BTreeSet;

/// A feeder with its gaps filled.
#[derive(Debug, Clone, PartialEq)]
pub struct FeederInputs {
    /// Tag, empty where none was entered.
    pub tag: String,
    /// What is driven.
    pub load: String,
    /// Whether it runs together with the others.
    pub is_running: bool,
    /// Motor power, where entered.
    pub motor_power: Option<Given<ShaftPower>>,
    /// Motor current, where entered.
    pub motor_current: Option<Given<Current>>,
    /// The drive's rated input current, where entered.
    pub drive_input: Option<Given<Current>>,
    /// The drive's loss, where entered.
    pub drive_loss: Option<Given<Power>>,
    /// Share of the loss carried outside.
    pub heatsink_share: Given<Ratio>,
    /// Choke in the drive.
    pub choke: Given<Ratio>,
    /// Highest ambient of the drive.
    pub ambient_limit: Given<Temperature>,
    /// Highest altitude of the drive.
    pub altitude_limit: Given<Length>,
    /// Device types which its instructions permit, where entered.
    pub permitted: Option<BTreeSet<DeviceType>>,
    /// Largest device which they permit, where entered.
    pub largest: Option<Given<Current>>,
    /// Short-circuit rating with its device, where entered.
    pub short_circuit_rating: Option<Given<Current>>,
    /// Device type.
    pub device: Given<DeviceType>,
    /// Device rating, where entered.
    pub device_rating: Option<Given<Current>>,
    /// Device loss, where entered.
    pub device_loss: Option<Given<Power>>,
    /// Reactor, where entered.
    pub reactor: Option<Given<Ratio>>,
    /// What its percentage refers to.
    pub reference: Reference,
    /// A reference current of its own, where entered.
    pub own_reference: Option<Given<Current>>,
    /// Its loss, where entered.
    pub reactor_loss: Option<Given<Power>>,
    /// Run ahead of the drive.
    pub ahead: RunInput,
    /// Run behind the drive.
    pub behind: RunInput,
    /// What was assumed.
    pub assumptions: Vec<Assumption>,
}

/// Fills the gaps of a feeder. `air` is the upper edge of the band in which the air inside lies, where it is known.
pub fn feeder(item: &Item, site: &Site, air: Option<Temperature>) -> FeederInputs {
    let mut reader = Reader::of(&item.record, Holder::Feeder(item.id));
    let permitted = item.record.choices(Field::PermittedTypes).map(|choices| {
        choices
            .iter()
            .map(|choice| device(*choice))
            .collect::<BTreeSet<_>>()
    });
    let usual_device = usual_device(item.record.choices(Field::PermittedTypes));
    let reactor: Option<Given<Ratio>> = reader.quantity(Field::ReactorPercent);
    let reference = match &reactor {
        Some(percent) if percent.value > Ratio::of_one(0.0) => {
            reader
                .choice_or(Field::ReactorReference, Choice::OfDriveInput)
                .value
        }
        _ => reader.quiet_choice_or(Field::ReactorReference, Choice::OfDriveInput),
    };
    FeederInputs {
        tag: reader.text(Field::Tag),
        load: reader.text(Field::Load),
        is_running: reader.choice_or(Field::Running, Choice::Together).value == Choice::Together,
        motor_power: reader.quantity(Field::MotorPower),
        motor_current: reader.quantity(Field::MotorCurrent),
        drive_input: reader.quantity(Field::DriveInput),
        drive_loss: reader.quantity(Field::DriveLoss),
        heatsink_share: reader.quantity_or(Field::HeatsinkShare, Ratio::of_one(0.0)),
        choke: reader.quantity_or(Field::DriveChoke, Ratio::of_one(0.0)),
        ambient_limit: reader.quantity_or(Field::DriveAmbientLimit, Temperature::celsius(40.0)),
        altitude_limit: reader.quantity_or(Field::DriveAltitudeLimit, Length::metres(1000.0)),
        permitted,
        largest: reader.quantity(Field::LargestPermitted),
        short_circuit_rating: reader.quantity(Field::ShortCircuitRating),
        device: mapped(reader.choice_or(Field::DeviceType, usual_device), device),
        device_rating: reader.quantity(Field::DeviceRating),
        device_loss: reader.quantity(Field::DeviceLoss),
        reactor,
        reference: match reference {
            Choice::OfMotorCurrent => Reference::MotorCurrent,
            Choice::OfOwnCurrent => Reference::Own,
            _ => Reference::DriveInput,
        },
        own_reference: reader.quantity(Field::ReactorReferenceCurrent),
        reactor_loss: reader.quantity(Field::ReactorLoss),
        ahead: run(&mut reader, Run::Ahead, Choice::Inside, &site.ambient, air),
        behind: run(&mut reader, Run::Behind, Choice::Field, &site.ambient, air),
        assumptions: reader.into_assumptions(),
    }
}

/// A time-delay fuse, or the first type which the drive's instructions permit where they leave that one out.
fn usual_device(permitted: Option<&BTreeSet<Choice>>) -> Choice {
    match permitted {
        Some(permitted) if !permitted.contains(&Choice::TimeDelayFuse) => {
            permitted.first().copied().unwrap_or(Choice::TimeDelayFuse)
        }
        _ => Choice::TimeDelayFuse,
    }
}

/// Length of a run inside until it is entered. Source: common practice.
const USUAL_INSIDE_LENGTH: Length = Length::metres(2.0);

/// Fills the gaps of a run which lies, unless entered otherwise, at `usual_place`.
pub(super) fn run(
    reader: &mut Reader<'_>,
    run: Run,
    usual_place: Choice,
    room: &Given<Temperature>,
    air: Option<Temperature>,
) -> RunInput {
    let field = |part| Field::Run(run, part);
    // The incoming run comes from outside; it has no place to choose.
    let place = match run {
        Run::Incoming => Choice::Field,
        Run::Ahead | Run::Behind => reader.choice_or(field(RunField::Place), usual_place).value,
    };
    let is_inside = place == Choice::Inside;
    let (surrounding, usual_insulation, length) = if is_inside {
        (
            Surrounding::Inside { air },
            Choice::Insulation90,
            Some(reader.quantity_or(field(RunField::Length), USUAL_INSIDE_LENGTH)),
        )
    } else {
        (
            Surrounding::Field {
                ambient: reader.quantity_or(field(RunField::Ambient), room.value),
                carrying: reader.count_or(field(RunField::Carrying), 3),
            },
            Choice::Insulation75,
            reader.quantity(field(RunField::Length)),
        )
    };
    RunInput {
        run,
        surrounding,
        metal: mapped(
            reader.choice_or(field(RunField::Metal), Choice::Copper),
            metal,
        ),
        sets: reader.count_or(field(RunField::Sets), 1),
        size: reader.record().size(field(RunField::Size)),
        insulation: mapped(
            reader.choice_or(field(RunField::Insulation), usual_insulation),
            column,
        ),
        terminal: mapped(
            reader.choice_or(field(RunField::Terminal), Choice::Unmarked),
            terminal,
        ),
        conduit: mapped(
            reader.choice_or(field(RunField::Conduit), usual_conduit(run)),
            conduit,
        ),
        length,
        power_factor: reader.quantity_or(field(RunField::PowerFactor), Ratio::of_one(0.85)),
    }
}

/// The cautious raceway: steel drops more voltage, and what is not magnetic lets more fault current through.
fn usual_conduit(run: Run) -> Choice {
    match run {
        Run::Incoming => Choice::PvcConduit,
        Run::Ahead | Run::Behind => Choice::SteelConduit,
    }
}

fn terminal(choice: Choice) -> Terminal {
    match choice {
        Choice::Marked60 => Terminal::Marked60,
        Choice::Marked75 => Terminal::Marked75,
        _ => Terminal::Unmarked,
    }
}
