//! The incoming circuit of a panel, and the input reactor.

use super::devices::plain_device;
use super::{
    Answers, DEVICES, Gathered, Inputs, METALS, Topic, Work, column, device, given, metal,
};
use crate::reference::keys::{Takes, missing, needed, optional};
use ventrail::quantity::{
    ApparentPower, Current, Frequency, Kind, Ratio, ShaftPower, Temperature, Voltage,
};
use ventrail::sizing::conductor::{RunInput, Surrounding, Terminal};
use ventrail::sizing::current::motor_full_load;
use ventrail::sizing::device::DeviceInput;
use ventrail::sizing::panel::{FeederLoad, IncomingInput, OtherLoad, incoming_circuit};
use ventrail::sizing::reactor::{Reactor, ReactorInput, ReactorSupply, Reference, reactor_of};
use ventrail::sizing::rules;
use ventrail::tables::{Column, Conduit, DeviceType, Edition};
use ventrail::working::{Field, Given, Run};

/// The panel.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "incoming circuit",
        about: "Conductors and main device of several drives or motors, NEC 409.20, 409.21(C), 430.24, 430.62(A): sizing::panel::incoming_circuit.",
        inputs: &[
            optional(
                "drives",
                Takes::Several(Kind::Current),
                "rated input currents of the drives, else the currents of the motors",
            ),
            optional(
                "motors",
                Takes::Several(Kind::Current),
                "full-load currents of the motors, else by power and supply; without either the main device is not worked",
            ),
            optional(
                "powers",
                Takes::Several(Kind::ShaftPower),
                "rated powers of the motors, for NEC Table 430.250",
            ),
            optional(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines, for the same table",
            ),
            optional(
                "others",
                Takes::Several(Kind::Current),
                "currents of other loads",
            ),
            optional(
                "main",
                Takes::Word(DEVICES),
                "type of the main device, else inverse time breaker",
            ),
            optional(
                "largest",
                Takes::Several(Kind::Current),
                "largest branch device which each drive's instructions permit",
            ),
            optional("metal", Takes::Word(METALS), "else copper"),
            optional(
                "sets",
                Takes::Count,
                "conductors in parallel for each phase, else 1",
            ),
            optional(
                "terminal",
                Takes::Measured(Kind::Temperature),
                "mark at the terminals, else none",
            ),
        ],
        expected: &[
            needed(
                "running",
                Takes::Measured(Kind::Current),
                "sum of the currents",
            ),
            needed(
                "required",
                Takes::Measured(Kind::Current),
                "ampacity asked for: 125 per cent of the largest and the others",
            ),
            needed(
                "size",
                Takes::Size,
                "smallest size which satisfies every rule",
            ),
            needed(
                "table",
                Takes::Measured(Kind::Current),
                "its cell in the column of the terminals",
            ),
            needed(
                "main_sum",
                Takes::Measured(Kind::Current),
                "largest branch device and the currents of the others",
            ),
            needed(
                "main_rating",
                Takes::Measured(Kind::Current),
                "standard rating at or below that sum",
            ),
        ],
        work: Work::Now(work_incoming),
    },
    Topic {
        name: "input reactor",
        about: "Need, inductance and reference of an input reactor: sizing::reactor::reactor_of.",
        inputs: &[
            needed(
                "drive_input",
                Takes::Measured(Kind::Current),
                "rated input current of the drive, to which percentages refer",
            ),
            needed(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines",
            ),
            needed(
                "frequency",
                Takes::Measured(Kind::Frequency),
                "of the supply",
            ),
            optional(
                "source",
                Takes::Measured(Kind::ApparentPower),
                "rated power of the transformer",
            ),
            optional(
                "source_impedance",
                Takes::Measured(Kind::Ratio),
                "its impedance, else 5.75 %",
            ),
            optional(
                "unbalance",
                Takes::Measured(Kind::Ratio),
                "of the line voltages, else none",
            ),
            optional(
                "choke",
                Takes::Measured(Kind::Ratio),
                "in the drive, else none",
            ),
            optional(
                "percent",
                Takes::Measured(Kind::Ratio),
                "the entered reactor, else none",
            ),
        ],
        expected: &[
            needed(
                "drive_power",
                Takes::Measured(Kind::ApparentPower),
                "apparent power of the drive",
            ),
            needed(
                "source_ratio",
                Takes::Measured(Kind::Ratio),
                "power of the source to that of the drive",
            ),
            needed(
                "drive_base",
                Takes::Measured(Kind::Ratio),
                "source impedance on the drive's base",
            ),
            needed(
                "advised",
                Takes::Measured(Kind::Ratio),
                "advised reactor; none where practice asks for none",
            ),
            needed(
                "inductance",
                Takes::Measured(Kind::Inductance),
                "of each phase of the entered reactor",
            ),
        ],
        work: Work::Now(work_reactor),
    },
];

fn motors_of(inputs: &Inputs) -> Result<Vec<Given<Current>>, String> {
    let motors = inputs.several::<Current>("motors");
    let powers = inputs.several::<ShaftPower>("powers");
    if !motors.is_empty() && !powers.is_empty() {
        return Err("motors stand by their currents or by their powers, not by both".to_owned());
    }
    if powers.is_empty() {
        return Ok(motors.into_iter().map(given).collect());
    }
    let supply = given(inputs.measured::<Voltage>("supply")?);
    powers
        .into_iter()
        .map(|power| {
            let power = Given::entered(Field::MotorPower, power);
            motor_full_load(Some(&power), None, &supply, &mut Vec::new())
                .ok_or_else(|| "the table has no such motor".to_owned())
        })
        .collect()
}

fn loads_of(inputs: &Inputs, main: DeviceType) -> Result<Vec<FeederLoad>, String> {
    let motors = motors_of(inputs)?;
    let drives: Vec<Given<Current>> = inputs.several("drives").into_iter().map(given).collect();
    let largest = inputs.several::<Current>("largest");
    for (name, length) in [("motors", motors.len()), ("largest", largest.len())] {
        let is_apart = !drives.is_empty() && length > 0 && length != drives.len();
        if is_apart {
            return Err(format!("drives and {name} differ in number"));
        }
    }
    let inputs_of_all = if drives.is_empty() {
        motors.clone()
    } else {
        drives
    };
    if inputs_of_all.is_empty() {
        return Err(missing("drives, motors, or powers with supply"));
    }
    Ok(inputs_of_all
        .into_iter()
        .enumerate()
        .map(|(position, drive_input)| FeederLoad {
            tag: format!("{}", position + 1).into(),
            is_running: true,
            branch: motors.get(position).map(|motor| DeviceInput {
                drive_input: Some(drive_input.clone()),
                largest: largest.get(position).copied().map(given),
                ..plain_device(main, motor.clone())
            }),
            drive_input,
        })
        .collect())
}

fn work_incoming(inputs: &Inputs) -> Result<Answers, String> {
    let main = device(inputs.word("main")).unwrap_or(DeviceType::InverseTimeBreaker);
    let others = inputs
        .several::<Current>("others")
        .into_iter()
        .map(|current| OtherLoad {
            name: "other".into(),
            is_running: true,
            current: given(current),
        });
    let terminal = match column(inputs, "terminal")? {
        None => Terminal::Unmarked,
        Some(Column::C60) => Terminal::Marked60,
        Some(_) => Terminal::Marked75,
    };
    let input = IncomingInput {
        feeders: loads_of(inputs, main)?,
        others: others.collect(),
        run: RunInput {
            run: Run::Incoming,
            surrounding: Surrounding::Field {
                ambient: given(Temperature::celsius(30.0)),
                carrying: given(3),
            },
            metal: given(metal(inputs)),
            sets: given(inputs.count_or("sets", 1)),
            size: None,
            insulation: given(Column::C90),
            terminal: given(terminal),
            conduit: given(Conduit::Steel),
            length: None,
            power_factor: given(Ratio::of_one(0.85)),
        },
        voltage: given(inputs.measured_or("supply", Voltage::volts(480.0))),
        main: given(main),
        main_rating: None,
        edition: Edition::Nec2023,
    };
    let incoming = incoming_circuit(&input, &mut Vec::new());
    let mut gathered = Gathered::default();
    gathered.figure("running", incoming.running.as_ref());
    if let Some(conductors) = &incoming.conductors {
        gathered
            .figure("required", Some(&conductors.required))
            .size("size", conductors.smallest())
            .step(
                "table",
                conductors.ampacity.as_ref(),
                rules::FIELD_TERMINAL_CELL.id,
            );
    }
    if let Some(main) = &incoming.main {
        gathered
            .figure("main_sum", Some(&main.sum))
            .figure("main_rating", main.largest.as_ref());
    }
    gathered.done()
}

fn work_reactor(inputs: &Inputs) -> Result<Answers, String> {
    let none = Ratio::of_one(0.0);
    let supply = ReactorSupply {
        voltage: given(inputs.measured::<Voltage>("supply")?),
        frequency: given(inputs.measured::<Frequency>("frequency")?),
        power: inputs.maybe::<ApparentPower>("source").map(given),
        impedance: given(inputs.measured_or("source_impedance", Ratio::per_cent(5.75))),
        fault: None,
        unbalance: given(inputs.measured_or("unbalance", none)),
        has_capacitors: false,
        has_surges: false,
    };
    let input = ReactorInput {
        drive_input: given(inputs.measured::<Current>("drive_input")?),
        motor_current: None,
        motor_power: None,
        choke: given(inputs.measured_or("choke", none)),
        percent: inputs.maybe::<Ratio>("percent").map(given),
        reference: Reference::DriveInput,
        own_reference: None,
        loss: None,
    };
    let Reactor {
        source_ratio,
        source_impedance,
        entered,
        advised,
        ..
    } = reactor_of(&input, &supply, &mut Vec::new());
    Gathered::default()
        .figure("source_ratio", source_ratio.as_ref())
        .step(
            "drive_power",
            source_ratio.as_ref(),
            rules::DRIVE_APPARENT_POWER.id,
        )
        .figure("drive_base", source_impedance.as_ref())
        .quantity("advised", advised.map(|size| size.percent))
        .figure("inductance", entered.as_ref().map(|size| &size.inductance))
        .done()
}
