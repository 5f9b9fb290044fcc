//! Motor current, branch device, disconnect, standard ratings.

use super::{Answers, DEVICES, Gathered, Inputs, Topic, Work, device, given};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use std::collections::BTreeSet;
use ventrail::quantity::{Current, Kind, ShaftPower, Voltage};
use ventrail::sizing::current::motor_full_load;
use ventrail::sizing::device::{DeviceInput, disconnect, size_branch_device};
use ventrail::tables::nec_ratings::{at_or_above, at_or_below};
use ventrail::tables::{DeviceType, Edition};
use ventrail::working::{Field, Given};

const MOTOR: Key = optional(
    "motor",
    Takes::Measured(Kind::Current),
    "full-load current, else by power and supply",
);
const POWER: Key = optional(
    "power",
    Takes::Measured(Kind::ShaftPower),
    "rated power, for NEC Table 430.250",
);
const SUPPLY: Key = optional(
    "supply",
    Takes::Measured(Kind::Voltage),
    "voltage between lines, for the same table",
);
const DEVICE: Key = needed("device", Takes::Word(DEVICES), "type of the device");

/// Devices.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "motor full-load current",
        about: "NEC Table 430.250 by power and supply: sizing::current::motor_full_load.",
        inputs: &[
            needed("power", Takes::Measured(Kind::ShaftPower), "rated power"),
            needed(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines",
            ),
        ],
        expected: &[needed(
            "motor",
            Takes::Measured(Kind::Current),
            "none where the table has no such motor",
        )],
        work: Work::Now(|inputs| {
            Gathered::default()
                .given("motor", table_current(inputs).as_ref())
                .done()
        }),
    },
    Topic {
        name: "branch device",
        about: "Branch device of a motor or drive, NEC 430.52, 430.130, 240.6(A): sizing::device::size_branch_device.",
        inputs: &[
            DEVICE,
            MOTOR,
            POWER,
            SUPPLY,
            optional(
                "drive_input",
                Takes::Measured(Kind::Current),
                "rated input current of the drive, for class CC fuses",
            ),
            optional(
                "largest",
                Takes::Measured(Kind::Current),
                "largest rating which the drive's instructions permit",
            ),
            optional(
                "permitted",
                Takes::Word(DEVICES),
                "the one type which they permit, else any",
            ),
        ],
        expected: &[
            needed(
                "motor",
                Takes::Measured(Kind::Current),
                "motor full-load current",
            ),
            needed(
                "product",
                Takes::Measured(Kind::Current),
                "percentage of the table times that current",
            ),
            needed(
                "rating",
                Takes::Measured(Kind::Current),
                "largest rating which rule and drive permit; none where no rating is right",
            ),
        ],
        work: Work::Now(work_branch_device),
    },
    Topic {
        name: "disconnect",
        about: "Smallest rating of a disconnect, NEC 430.128: sizing::device::disconnect.",
        inputs: &[needed(
            "current",
            Takes::Measured(Kind::Current),
            "rated input current of the drive; of a plain motor its full-load current (430.110)",
        )],
        expected: &[needed(
            "rating",
            Takes::Measured(Kind::Current),
            "smallest rating",
        )],
        work: Work::Now(|inputs| {
            let rating = disconnect(&given(inputs.measured::<Current>("current")?));
            Gathered::default().figure("rating", Some(&rating)).done()
        }),
    },
    Topic {
        name: "standard rating",
        about: "Standard rating next to a current, NEC 240.6(A), edition 2023: tables::nec_ratings.",
        inputs: &[
            DEVICE,
            needed("current", Takes::Measured(Kind::Current), "the current"),
            needed(
                "round",
                Takes::Word(&["up", "down"]),
                "to the rating at or above, or at or below",
            ),
        ],
        expected: &[needed(
            "rating",
            Takes::Measured(Kind::Current),
            "none beyond the ends of the list",
        )],
        work: Work::Now(work_standard_rating),
    },
];

fn table_current(inputs: &Inputs) -> Option<Given<Current>> {
    let power = Given::entered(Field::MotorPower, inputs.maybe::<ShaftPower>("power")?);
    let supply = given(inputs.maybe::<Voltage>("supply")?);
    motor_full_load(Some(&power), None, &supply, &mut Vec::new())
}

/// The motor current as put in, else by the table.
pub fn motor_current(inputs: &Inputs) -> Result<Given<Current>, String> {
    match inputs.maybe::<Current>("motor") {
        Some(current) => Ok(given(current)),
        None => table_current(inputs)
            .ok_or_else(|| missing("motor, or power and supply of a row of the table")),
    }
}

/// What a device is sized from where only its type and the motor are known.
pub fn plain_device(device: DeviceType, motor: Given<Current>) -> DeviceInput {
    DeviceInput {
        device: given(device),
        motor_current: motor,
        drive_input: None,
        permitted: None,
        largest: None,
        rating: None,
    }
}

fn work_branch_device(inputs: &Inputs) -> Result<Answers, String> {
    let motor = motor_current(inputs)?;
    let type_of = device(inputs.word("device")).ok_or_else(|| missing("device"))?;
    let input = DeviceInput {
        drive_input: inputs.maybe::<Current>("drive_input").map(given),
        permitted: device(inputs.word("permitted")).map(|one| BTreeSet::from([one])),
        largest: inputs.maybe::<Current>("largest").map(given),
        ..plain_device(type_of, motor.clone())
    };
    let sized = size_branch_device(&input, Edition::Nec2023, &mut Vec::new());
    Gathered::default()
        .given("motor", Some(&motor))
        .figure("product", Some(&sized.product))
        .figure("rating", sized.largest.as_ref())
        .done()
}

fn work_standard_rating(inputs: &Inputs) -> Result<Answers, String> {
    let current = inputs.measured("current")?;
    let device = device(inputs.word("device")).ok_or_else(|| missing("device"))?;
    let rating = match inputs.word("round") {
        Some("up") => at_or_above(current, device, Edition::Nec2023),
        _ => at_or_below(current, device, Edition::Nec2023),
    };
    Gathered::default().quantity("rating", rating).done()
}
