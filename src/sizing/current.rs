//! Currents from which a feeder is sized: motor full load, and the drive's rated input.

use crate::physics::circuit::drive_input_current;
use crate::quantity::{Current, Ratio, ShaftPower, Voltage};
use crate::sizing::rules;
use crate::tables::nec_motors::{MotorRow, MotorVoltage, motor_row};
use crate::working::{Field, Given, Grade, MarginNote, NoteKind, Origin, Term};
use std::sync::Arc;

/// The choke or reactor, entered, from which an assumed input current may be taken as smooth.
pub const SMOOTHING_REACTOR: Ratio = Ratio::per_cent(3.0);

/// Motor full-load current: as entered, else by NEC Table 430.250 from power and supply voltage.
///
/// `None` where nothing says how large the motor is, or where the table has no such motor (with a `stop`).
pub fn motor_full_load(
    power: Option<&Given<ShaftPower>>,
    entered: Option<&Given<Current>>,
    voltage: &Given<Voltage>,
    notes: &mut Vec<MarginNote>,
) -> Option<Given<Current>> {
    if let Some(entered) = entered {
        return Some(entered.clone());
    }
    let power = power?;
    let (row, column, is_exact) = table_row(power, voltage, notes)?;
    if !is_exact {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::MotorPower,
            NoteKind::MotorBetweenRows {
                power: power.value,
                row: row.power,
            },
        ));
    }
    let figure = rules::MOTOR_TABLE_CURRENT.figure(
        row.current(column)?,
        [
            power.term("P_m"),
            Term::constant("row", row.power),
            voltage.term("U"),
            Term::constant("column", column.voltage()),
        ],
    );
    Given::from_figure(&Arc::new(figure))
}

fn table_row(
    power: &Given<ShaftPower>,
    voltage: &Given<Voltage>,
    notes: &mut Vec<MarginNote>,
) -> Option<(MotorRow, MotorVoltage, bool)> {
    let Some(column) = MotorVoltage::serving(voltage.value) else {
        notes.push(MarginNote::new(
            Grade::Stop,
            Field::MotorPower,
            NoteKind::SupplyVoltageUnserved {
                voltage: voltage.value,
            },
        ));
        return None;
    };
    let found = motor_row(power.value, column);
    if found.is_none() {
        notes.push(MarginNote::new(
            Grade::Stop,
            Field::MotorPower,
            NoteKind::MotorNotInTable { power: power.value },
        ));
    }
    found.map(|(row, is_exact)| (row, column, is_exact))
}

/// What an assumed drive input current rests on.
#[derive(Debug, Clone, PartialEq)]
pub struct DriveInputBasis<'a> {
    /// Motor power.
    pub power: Option<&'a Given<ShaftPower>>,
    /// Motor full-load current.
    pub motor_current: &'a Given<Current>,
    /// Supply voltage.
    pub voltage: &'a Given<Voltage>,
    /// Choke of the drive or entered reactor, the larger; never one which is only advised.
    pub smoothing: Ratio,
}

/// The drive's rated input current: as entered, else assumed, with a `query`.
pub fn drive_input(
    entered: Option<&Given<Current>>,
    basis: &DriveInputBasis<'_>,
    notes: &mut Vec<MarginNote>,
) -> Option<Given<Current>> {
    if let Some(entered) = entered {
        let motor = basis.motor_current.value;
        if entered.value < motor {
            notes.push(MarginNote::new(
                Grade::Query,
                Field::DriveInput,
                NoteKind::DriveSmallerThanMotor {
                    input: entered.value,
                    motor,
                },
            ));
        }
        return Some(entered.clone());
    }
    let assumed = assumed_drive_input(basis);
    match &assumed {
        Some(assumed) => {
            let note = MarginNote::new(
                Grade::Query,
                Field::DriveInput,
                NoteKind::DriveInputAssumed {
                    assumed: assumed.value,
                },
            );
            notes.push(match &assumed.origin {
                Origin::Figure(figure) => note.about(figure),
                _ => note,
            });
        }
        None => notes.push(MarginNote::new(
            Grade::Query,
            Field::DriveInput,
            NoteKind::DriveInputUnknown,
        )),
    }
    assumed
}

/// The input current of the drive for the next row of Table 430.250 at or above the motor; never below the motor's.
fn assumed_drive_input(basis: &DriveInputBasis<'_>) -> Option<Given<Current>> {
    let power = basis.power?;
    let column = MotorVoltage::serving(basis.voltage.value)?;
    let (row, _) = motor_row(power.value, column)?;
    let practice = DrivePractice::for_motor(row.power, basis.smoothing);
    let current = drive_input_current(
        row.power,
        basis.voltage.value,
        practice.motor_efficiency,
        DRIVE_EFFICIENCY,
        practice.power_factor,
    );
    let by_power = Arc::new(rules::DRIVE_INPUT_ASSUMED.assumed_figure(
        current,
        [
            Term::constant("P", row.power),
            Term::constant("eta_m", practice.motor_efficiency),
            Term::constant("eta_d", DRIVE_EFFICIENCY),
            basis.voltage.term("U"),
            Term::constant("lambda", practice.power_factor),
        ],
    ));
    if current >= basis.motor_current.value {
        return Given::from_figure(&by_power);
    }
    let floor = rules::DRIVE_INPUT_AT_LEAST_MOTOR.assumed_figure(
        basis.motor_current.value,
        [Term::of("I_in", &by_power), basis.motor_current.term("I_m")],
    );
    Given::from_figure(&Arc::new(floor))
}

const DRIVE_EFFICIENCY: Ratio = Ratio::of_one(0.97);

/// Efficiency and power factor of a small drive without data.
struct DrivePractice {
    motor_efficiency: Ratio,
    power_factor: Ratio,
}

impl DrivePractice {
    fn for_motor(row: ShaftPower, smoothing: Ratio) -> Self {
        let horsepower = row.to_horsepower();
        let (motor_efficiency, bare_power_factor) = if horsepower <= 3.0 {
            (0.80, 0.45)
        } else if horsepower <= 10.0 {
            (0.86, 0.60)
        } else {
            (0.90, 0.65)
        };
        let power_factor = if smoothing >= SMOOTHING_REACTOR {
            0.88
        } else {
            bare_power_factor
        };
        Self {
            motor_efficiency: Ratio::of_one(motor_efficiency),
            power_factor: Ratio::of_one(power_factor),
        }
    }
}
