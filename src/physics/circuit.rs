//! Alternating-current circuits: currents, voltage drop, reactors, point-to-point fault currents.

use crate::quantity::{
    ApparentPower, Current, Frequency, ImpedancePerLength, Inductance, Length, LengthPerImpedance,
    Quantity, Ratio, ShaftPower, Voltage,
};
use core::f64::consts::PI;

/// Square root of three: line quantities of a balanced three-phase circuit.
pub const SQRT_3: f64 = 1.732_050_807_568_877_2;

/// Apparent power of a balanced three-phase circuit.
///
/// S = sqrt(3) * U * I; U voltage between lines, I line current.
pub fn apparent_power(voltage: Voltage, current: Current) -> ApparentPower {
    SQRT_3 * (voltage * current)
}

/// Full-load current of a three-phase transformer's winding.
///
/// I = S / (sqrt(3) * U); S rated power, U voltage between lines.
pub fn transformer_current(power: ApparentPower, voltage: Voltage) -> Current {
    Current::amperes(power.to_volt_amperes() / (SQRT_3 * voltage.to_volts()))
}

/// Line current which a drive takes to give a motor its rated power.
///
/// I = P / (eta_m * eta_d * sqrt(3) * U * lambda); P shaft power, eta efficiencies of motor and drive, U voltage between
/// lines, lambda true power factor at the drive's input.
pub fn drive_input_current(
    power: ShaftPower,
    voltage: Voltage,
    motor_efficiency: Ratio,
    drive_efficiency: Ratio,
    power_factor: Ratio,
) -> Current {
    let efficiency = motor_efficiency.to_one() * drive_efficiency.to_one();
    Current::amperes(
        power.to_watts() / (efficiency * SQRT_3 * voltage.to_volts() * power_factor.to_one()),
    )
}

/// A conductor run as the drop sees it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct DropRun {
    /// Resistance of one conductor at its working temperature.
    pub resistance: ImpedancePerLength,
    /// Reactance of one conductor.
    pub reactance: ImpedancePerLength,
    /// Length one way.
    pub length: Length,
    /// Conductors in parallel.
    pub sets: u32,
}

/// Voltage drop between lines along a three-phase run.
///
/// dU = sqrt(3) * I * (R * cosphi + X * sinphi) * L / n; I line current,
/// R and X resistance and reactance of one conductor for its length, L length one way, n conductors in parallel.
/// The usual approximation of the exact difference of magnitudes; it leaves out the angle between the two ends.
/// Source: NEC 2023, Chapter 9, Table 9, note 2.
pub fn voltage_drop(current: Current, power_factor: Ratio, run: DropRun) -> Voltage {
    let cosphi = power_factor.to_one();
    let sinphi = reactive_factor(power_factor).to_one();
    let effective =
        run.resistance.to_ohms_per_metre() * cosphi + run.reactance.to_ohms_per_metre() * sinphi;
    Voltage::volts(
        SQRT_3 * current.to_amperes() * effective * run.length.to_metres() / f64::from(run.sets),
    )
}

/// Sine of the angle whose cosine is the power factor.
///
/// sinphi = sqrt(1 - cosphi * cosphi).
pub fn reactive_factor(power_factor: Ratio) -> Ratio {
    let cosphi = power_factor.to_one();
    Ratio::of_one((1.0 - cosphi * cosphi).max(0.0).sqrt())
}

/// Inductance of each phase of a reactor of a percentage.
///
/// L = z * U / (sqrt(3) * 2 * pi * f * I); z percentage as a ratio, U voltage between lines, f line frequency, I the
/// current to which the percentage refers.
pub fn reactor_inductance(
    percent: Ratio,
    voltage: Voltage,
    frequency: Frequency,
    reference: Current,
) -> Inductance {
    Inductance::henries(
        percent.to_one() * voltage.to_volts()
            / (SQRT_3 * 2.0 * PI * frequency.to_hertz() * reference.to_amperes()),
    )
}

/// Source impedance on the base of a drive.
///
/// z = z_t * S_drive / S_t; z_t impedance of the transformer as a ratio, S rated powers of drive and transformer.
pub fn impedance_on_base(impedance: Ratio, source: ApparentPower, base: ApparentPower) -> Ratio {
    impedance * (base / source)
}

/// Source impedance on the base of a drive, from the fault current of the source.
///
/// z = S_drive / (sqrt(3) * U * I_sc); U voltage between lines, I_sc fault current of the source.
pub fn impedance_of_fault_current(base: ApparentPower, voltage: Voltage, fault: Current) -> Ratio {
    base / apparent_power(voltage, fault)
}

/// Fault current at the terminals of a transformer fed from an infinite bus.
///
/// I = I_fl / (z * t); I_fl full-load current, z impedance as a ratio, t share of it which is counted: 0.9 for the
/// largest current with a nameplate impedance.
/// Source: point-to-point method.
pub fn transformer_fault_current(full_load: Current, impedance: Ratio, counted: Ratio) -> Current {
    Current::amperes(full_load.to_amperes() / (impedance.to_one() * counted.to_one()))
}

/// A run as the point-to-point method sees it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FaultRun {
    /// The constant C of one conductor.
    pub constant: LengthPerImpedance,
    /// Length one way.
    pub length: Length,
    /// Conductors in parallel.
    pub sets: u32,
}

/// The factor f of a run: its impedance against that of everything before it.
///
/// f = sqrt(3) * L * I / (C * n * U); L length one way,
/// I fault current at its start, C constant of the conductor, n conductors in parallel, U voltage between lines.
/// Source: point-to-point method.
pub fn run_factor(at_start: Current, voltage: Voltage, run: FaultRun) -> Ratio {
    Ratio::of_one(
        SQRT_3 * run.length.to_metres() * at_start.to_amperes()
            / (run.constant.to_metres_per_ohm() * f64::from(run.sets) * voltage.to_volts()),
    )
}

/// The multiplier M of a run: M = 1 / (1 + f). Source: point-to-point method.
pub fn run_multiplier(factor: Ratio) -> Ratio {
    Ratio::of_one(1.0 / (1.0 + factor.to_one()))
}

/// A product of a ratio and a quantity: the form of every `125 per cent of` rule.
///
/// y = k * x.
pub fn share_of<Q: Quantity>(ratio: Ratio, quantity: Q) -> Q {
    Q::from_si(ratio.to_one() * quantity.si())
}
