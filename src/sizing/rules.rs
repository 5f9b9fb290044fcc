//! Every rule which a figure can cite, in one list: expression, symbols, authority.
//!
//! The formulas themselves are functions of `physics`; `tests/printed_formulas.rs` proves that what is printed here is
//! what they compute. Clauses are those of NEC 2023.

use crate::working::sources::{
    IEC_60269_2, IEC_60890, IEC_60898_1, NEC, PHYSICS, POINT_TO_POINT, STANDARD_ATMOSPHERE, TRADE,
    UL_508A,
};
use crate::working::{Form, Known, Rule};

/// Motor full-load current by power and supply voltage; a power between two rows takes the next row up.
pub static MOTOR_TABLE_CURRENT: Rule = Rule {
    id: "sizing.motor.table_current",
    gives: "I_m",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 430.250, 430.6(A)(1)",
    known: Known::CrossChecked,
};

/// The drive's rated input current, until it is typed.
pub static DRIVE_INPUT_ASSUMED: Rule = Rule {
    id: "sizing.drive.input_assumed",
    gives: "I_in",
    form: Form::Formula {
        expression: "P / (eta_m * eta_d * sqrt(3) * U * lambda)",
        symbols: &["P", "eta_m", "eta_d", "U", "lambda"],
    },
    source: &TRADE,
    clause: "efficiencies and power factors of small drives without reactors",
    known: Known::CommonPractice,
};

/// An assumed input current is never below the motor's.
pub static DRIVE_INPUT_AT_LEAST_MOTOR: Rule = Rule {
    id: "sizing.drive.input_at_least_motor",
    gives: "I_in",
    form: Form::Choice,
    source: &TRADE,
    clause: "a drive takes at least its motor's current",
    known: Known::CommonPractice,
};

/// Ampacity of conductors ahead of a drive.
pub static INPUT_AMPACITY: Rule = Rule {
    id: "sizing.conductor.input_ampacity",
    gives: "I_z",
    form: Form::Formula {
        expression: "1.25 * I_in",
        symbols: &["I_in"],
    },
    source: &NEC,
    clause: "430.122(A)",
    known: Known::CrossChecked,
};

/// Ampacity of conductors behind a drive.
pub static OUTPUT_AMPACITY: Rule = Rule {
    id: "sizing.conductor.output_ampacity",
    gives: "I_z",
    form: Form::Formula {
        expression: "1.25 * I_m",
        symbols: &["I_m"],
    },
    source: &NEC,
    clause: "430.122(B), 430.22",
    known: Known::Read,
};

/// Ampacity of one conductor inside, column by the marking of the terminals.
pub static INSIDE_CELL: Rule = Rule {
    id: "sizing.conductor.inside_cell",
    gives: "I_t",
    form: Form::Lookup,
    source: &UL_508A,
    clause: "Table 28.1, 29.6",
    known: Known::FromMemory,
};

/// Ampacity of one conductor in the column of the terminals.
pub static FIELD_TERMINAL_CELL: Rule = Rule {
    id: "sizing.conductor.field_terminal_cell",
    gives: "I_t",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 310.16, 110.14(C)(1)",
    known: Known::CrossChecked,
};

/// Ampacity of one conductor in the column of its insulation.
pub static FIELD_INSULATION_CELL: Rule = Rule {
    id: "sizing.conductor.field_insulation_cell",
    gives: "I_i",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 310.16",
    known: Known::CrossChecked,
};

/// Factor for the temperature of the air; between two bands the hotter one.
pub static AMBIENT_FACTOR: Rule = Rule {
    id: "sizing.conductor.ambient_factor",
    gives: "k_a",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 310.15(B)(1)(1)",
    known: Known::CrossChecked,
};

/// Factor for more than three current-carrying conductors.
pub static COUNT_FACTOR: Rule = Rule {
    id: "sizing.conductor.count_factor",
    gives: "k_c",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 310.15(C)(1)",
    known: Known::CrossChecked,
};

/// Ampacity of all conductors of a phase by their terminals.
pub static TERMINAL_AMPACITY: Rule = Rule {
    id: "sizing.conductor.terminal_ampacity",
    gives: "I_T",
    form: Form::Formula {
        expression: "n * I_t",
        symbols: &["n", "I_t"],
    },
    source: &NEC,
    clause: "110.14(C)(1), 310.10(G)",
    known: Known::CrossChecked,
};

/// Ampacity of all conductors of a phase by their insulation, corrected.
pub static CORRECTED_AMPACITY: Rule = Rule {
    id: "sizing.conductor.corrected_ampacity",
    gives: "I_C",
    form: Form::Formula {
        expression: "n * I_i * k_a * k_c",
        symbols: &["n", "I_i", "k_a", "k_c"],
    },
    source: &NEC,
    clause: "310.15(B), 310.15(C)",
    known: Known::CrossChecked,
};

/// The smaller of the two ampacities.
pub static USABLE_AMPACITY: Rule = Rule {
    id: "sizing.conductor.usable_ampacity",
    gives: "I_u",
    form: Form::Choice,
    source: &NEC,
    clause: "110.14(C), 310.15",
    known: Known::CrossChecked,
};

/// The smallest size whose ampacities all reach the one asked for.
pub static CONDUCTOR_SIZE: Rule = Rule {
    id: "sizing.conductor.size",
    gives: "size",
    form: Form::Choice,
    source: &NEC,
    clause: "430.22, 430.24, 430.122, 310.3(A), 310.10(G)",
    known: Known::CrossChecked,
};

/// A size which was entered, against the smallest which fits.
pub static CONDUCTOR_ENTERED: Rule = Rule {
    id: "sizing.conductor.entered",
    gives: "size",
    form: Form::Choice,
    source: &NEC,
    clause: "430.22, 430.122",
    known: Known::CrossChecked,
};

/// Alternating-current resistance at 75 degrees Celsius.
pub static TABLE_9_RESISTANCE: Rule = Rule {
    id: "sizing.drop.resistance",
    gives: "R",
    form: Form::Lookup,
    source: &NEC,
    clause: "Chapter 9, Table 9",
    known: Known::CrossChecked,
};

/// Reactance.
pub static TABLE_9_REACTANCE: Rule = Rule {
    id: "sizing.drop.reactance",
    gives: "X",
    form: Form::Lookup,
    source: &NEC,
    clause: "Chapter 9, Table 9",
    known: Known::CrossChecked,
};

/// Sine of the phase angle.
pub static REACTIVE_FACTOR: Rule = Rule {
    id: "physics.circuit.reactive_factor",
    gives: "sinphi",
    form: Form::Formula {
        expression: "sqrt(1 - cosphi * cosphi)",
        symbols: &["cosphi"],
    },
    source: &PHYSICS,
    clause: "sine of the angle between voltage and current",
    known: Known::Derived,
};

/// Voltage drop between lines.
pub static VOLTAGE_DROP: Rule = Rule {
    id: "physics.circuit.voltage_drop",
    gives: "dU",
    form: Form::Formula {
        expression: "sqrt(3) * I * (R * cosphi + X * sinphi) * L / n",
        symbols: &["I", "R", "cosphi", "X", "sinphi", "L", "n"],
    },
    source: &NEC,
    clause: "Chapter 9, Table 9, note 2",
    known: Known::CrossChecked,
};

/// Drop as a share of the supply voltage.
pub static DROP_RATIO: Rule = Rule {
    id: "sizing.drop.ratio",
    gives: "d",
    form: Form::Formula {
        expression: "dU / U",
        symbols: &["dU", "U"],
    },
    source: &NEC,
    clause: "210.19(A) and 215.2(A), informational notes",
    known: Known::CrossChecked,
};

/// Drop of both runs.
pub static DROP_BOTH: Rule = Rule {
    id: "sizing.drop.both_runs",
    gives: "d",
    form: Form::Sum,
    source: &NEC,
    clause: "210.19(A) and 215.2(A), informational notes",
    known: Known::CrossChecked,
};

/// Direct-current resistance at 75 degrees Celsius.
pub static TABLE_8_RESISTANCE: Rule = Rule {
    id: "sizing.heat.conductor_resistance",
    gives: "R",
    form: Form::Lookup,
    source: &NEC,
    clause: "Chapter 9, Table 8",
    known: Known::Read,
};

/// Heat of the three conductors of a run.
pub static RUN_HEAT: Rule = Rule {
    id: "physics.heat.run_loss",
    gives: "P",
    form: Form::Formula {
        expression: "3 * I * I * R * L / n",
        symbols: &["I", "R", "L", "n"],
    },
    source: &PHYSICS,
    clause: "Joule's law",
    known: Known::Derived,
};

/// Largest device as a ratio of motor full-load current, column dual-element time-delay fuse.
pub static TIME_DELAY_PERCENTAGE: Rule = Rule {
    id: "sizing.device.time_delay_percentage",
    gives: "p",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 430.52(C)(1), dual-element time-delay fuse",
    known: Known::CrossChecked,
};

/// Largest device as a ratio of motor full-load current, column nontime-delay fuse, also Class CC.
pub static NONTIME_DELAY_PERCENTAGE: Rule = Rule {
    id: "sizing.device.nontime_delay_percentage",
    gives: "p",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 430.52(C)(1), nontime-delay fuse, also Class CC",
    known: Known::CrossChecked,
};

/// Largest device as a ratio of motor full-load current, column inverse time breaker.
pub static BREAKER_PERCENTAGE: Rule = Rule {
    id: "sizing.device.breaker_percentage",
    gives: "p",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 430.52(C)(1), inverse time breaker",
    known: Known::CrossChecked,
};

/// Percentage times motor full-load current.
pub static DEVICE_PRODUCT: Rule = Rule {
    id: "sizing.device.product",
    gives: "I_d",
    form: Form::Formula {
        expression: "p * I_m",
        symbols: &["p", "I_m"],
    },
    source: &NEC,
    clause: "430.52(C)(1), 430.130(A)",
    known: Known::FromMemory,
};

/// The product where it is a standard rating, else the next higher one.
pub static DEVICE_STANDARD: Rule = Rule {
    id: "sizing.device.next_standard",
    gives: "I_n",
    form: Form::Lookup,
    source: &NEC,
    clause: "240.6(A), 430.52(C)(1) Exception 1",
    known: Known::Read,
};

/// Class CC fuses end at 30 A.
pub static DEVICE_CLASS_CC: Rule = Rule {
    id: "sizing.device.class_cc",
    gives: "I_n",
    form: Form::Choice,
    source: &NEC,
    clause: "430.52(C)(1); Class CC fuses end at 30 A",
    known: Known::CrossChecked,
};

/// Never above the largest rating which the drive's instructions permit.
pub static DEVICE_DRIVE_LIMIT: Rule = Rule {
    id: "sizing.device.drive_limit",
    gives: "I_n",
    form: Form::Choice,
    source: &NEC,
    clause: "430.52(C)(2)",
    known: Known::Read,
};

/// Smallest rating of the disconnect of a drive.
pub static DISCONNECT: Rule = Rule {
    id: "sizing.device.disconnect",
    gives: "I_s",
    form: Form::Formula {
        expression: "1.15 * I_in",
        symbols: &["I_in"],
    },
    source: &NEC,
    clause: "430.128",
    known: Known::FromMemory,
};

/// Equipment grounding conductor by the rating of the device.
pub static GROUNDING_TABLE: Rule = Rule {
    id: "sizing.grounding.table",
    gives: "size",
    form: Form::Lookup,
    source: &NEC,
    clause: "Table 250.122",
    known: Known::Read,
};

/// Area of a conductor.
pub static TABLE_8_AREA: Rule = Rule {
    id: "sizing.grounding.area",
    gives: "A",
    form: Form::Lookup,
    source: &NEC,
    clause: "Chapter 9, Table 8",
    known: Known::Read,
};

/// Installed area of a phase over the smallest which fits; unrounded.
pub static GROUNDING_RATIO: Rule = Rule {
    id: "sizing.grounding.ratio",
    gives: "r",
    form: Form::Formula {
        expression: "n_i * A_i / (n_s * A_s)",
        symbols: &["n_i", "A_i", "n_s", "A_s"],
    },
    source: &NEC,
    clause: "250.122(B)",
    known: Known::CrossChecked,
};

/// Area of the grown grounding conductor.
pub static GROUNDING_AREA: Rule = Rule {
    id: "sizing.grounding.grown_area",
    gives: "A_g",
    form: Form::Formula {
        expression: "r * A_t",
        symbols: &["r", "A_t"],
    },
    source: &NEC,
    clause: "250.122(B)",
    known: Known::CrossChecked,
};

/// The size with at least that area, never larger than the phase conductor of its raceway.
pub static GROUNDING_SIZE: Rule = Rule {
    id: "sizing.grounding.size",
    gives: "size",
    form: Form::Choice,
    source: &NEC,
    clause: "250.122(A), 250.122(B)",
    known: Known::CrossChecked,
};

/// Apparent power of a drive's rated input.
pub static DRIVE_APPARENT_POWER: Rule = Rule {
    id: "physics.circuit.apparent_power",
    gives: "S_d",
    form: Form::Formula {
        expression: "sqrt(3) * U * I_in",
        symbols: &["U", "I_in"],
    },
    source: &PHYSICS,
    clause: "apparent power of three phases",
    known: Known::Derived,
};

/// Source power over the drive's.
pub static SOURCE_RATIO: Rule = Rule {
    id: "sizing.reactor.source_ratio",
    gives: "r",
    form: Form::Formula {
        expression: "S_t / S_d",
        symbols: &["S_t", "S_d"],
    },
    source: &TRADE,
    clause: "source power over drive power",
    known: Known::CrossChecked,
};

/// Source impedance on the drive's base.
pub static SOURCE_IMPEDANCE: Rule = Rule {
    id: "physics.circuit.impedance_on_base",
    gives: "z",
    form: Form::Formula {
        expression: "z_t * S_d / S_t",
        symbols: &["z_t", "S_d", "S_t"],
    },
    source: &TRADE,
    clause: "source impedance on the drive's base",
    known: Known::Read,
};

/// Source impedance on the drive's base, from the fault current of the source.
pub static SOURCE_IMPEDANCE_BY_FAULT: Rule = Rule {
    id: "physics.circuit.impedance_of_fault_current",
    gives: "z",
    form: Form::Formula {
        expression: "S_d / (sqrt(3) * U * I_sc)",
        symbols: &["S_d", "U", "I_sc"],
    },
    source: &TRADE,
    clause: "source impedance on the drive's base",
    known: Known::Read,
};

/// Inductance of each phase.
pub static REACTOR_INDUCTANCE: Rule = Rule {
    id: "physics.circuit.reactor_inductance",
    gives: "L",
    form: Form::Formula {
        expression: "z * U / (sqrt(3) * 2 * pi * f * I_r)",
        symbols: &["z", "U", "f", "I_r"],
    },
    source: &PHYSICS,
    clause: "reactance of a percentage of the drive's base",
    known: Known::CrossChecked,
};

/// Smallest rated current of the reactor.
pub static REACTOR_CURRENT: Rule = Rule {
    id: "sizing.reactor.rated_current",
    gives: "I",
    form: Form::Choice,
    source: &TRADE,
    clause: "a reactor carries the drive's rated input current",
    known: Known::Read,
};

/// Loss of a reactor without data.
pub static REACTOR_HEAT_ASSUMED: Rule = Rule {
    id: "physics.heat.reactor_loss_by_motor",
    gives: "P",
    form: Form::Formula {
        expression: "p * P_m",
        symbols: &["p", "P_m"],
    },
    source: &TRADE,
    clause: "half a per cent of motor power; printed figures run from 0.14 to 1 per cent of the drive's power",
    known: Known::Read,
};

/// Full-load current of the transformer.
pub static TRANSFORMER_CURRENT: Rule = Rule {
    id: "physics.circuit.transformer_current",
    gives: "I_fl",
    form: Form::Formula {
        expression: "S_t / (sqrt(3) * U)",
        symbols: &["S_t", "U"],
    },
    source: &PHYSICS,
    clause: "rated current of three phases",
    known: Known::Derived,
};

/// Fault current at the transformer.
pub static TRANSFORMER_FAULT: Rule = Rule {
    id: "physics.circuit.transformer_fault",
    gives: "I_sc",
    form: Form::Formula {
        expression: "I_fl / (z_t * t)",
        symbols: &["I_fl", "z_t", "t"],
    },
    source: &POINT_TO_POINT,
    clause: "transformer, infinite bus; 0.9 of the nameplate impedance for the largest current",
    known: Known::CrossChecked,
};

/// The constant C of a conductor.
pub static FAULT_CONSTANT: Rule = Rule {
    id: "sizing.fault.constant",
    gives: "C",
    form: Form::Lookup,
    source: &POINT_TO_POINT,
    clause: "C values, 600 V class, three single conductors in conduit",
    known: Known::Read,
};

/// Impedance of the run against that before it.
pub static RUN_FACTOR: Rule = Rule {
    id: "physics.circuit.run_factor",
    gives: "f",
    form: Form::Formula {
        expression: "sqrt(3) * L * I_sc / (C * n * U)",
        symbols: &["L", "I_sc", "C", "n", "U"],
    },
    source: &POINT_TO_POINT,
    clause: "factor f of a run",
    known: Known::Read,
};

/// What is left of the fault current after the run.
pub static RUN_MULTIPLIER: Rule = Rule {
    id: "physics.circuit.run_multiplier",
    gives: "M",
    form: Form::Formula {
        expression: "1 / (1 + f)",
        symbols: &["f"],
    },
    source: &POINT_TO_POINT,
    clause: "multiplier M of a run",
    known: Known::Read,
};

/// Fault current at the panel.
pub static FAULT_AT_PANEL: Rule = Rule {
    id: "sizing.fault.at_panel",
    gives: "I_p",
    form: Form::Formula {
        expression: "M * I_sc",
        symbols: &["M", "I_sc"],
    },
    source: &POINT_TO_POINT,
    clause: "fault current at the end of a run",
    known: Known::Read,
};

/// Rated input currents of what runs together.
pub static RUNNING_CURRENT: Rule = Rule {
    id: "sizing.panel.running_current",
    gives: "I",
    form: Form::Sum,
    source: &NEC,
    clause: "409.20, 430.24",
    known: Known::Read,
};

/// Rated input currents of everything connected.
pub static CONNECTED_CURRENT: Rule = Rule {
    id: "sizing.panel.connected_current",
    gives: "I",
    form: Form::Sum,
    source: &NEC,
    clause: "409.20, 430.24",
    known: Known::Read,
};

/// 125 per cent of the largest drive input current, 100 per cent of the others.
pub static INCOMING_AMPACITY: Rule = Rule {
    id: "sizing.panel.incoming_ampacity",
    gives: "I_z",
    form: Form::Formula {
        expression: "1.25 * I_1 + I_o",
        symbols: &["I_1", "I_o"],
    },
    source: &NEC,
    clause: "409.20, 430.24, 430.122(D)",
    known: Known::FromMemory,
};

/// Input currents of the others.
pub static OTHER_INPUTS: Rule = Rule {
    id: "sizing.panel.other_inputs",
    gives: "I_o",
    form: Form::Sum,
    source: &NEC,
    clause: "409.20, 430.24",
    known: Known::Read,
};

/// Full-load currents of the other motors and loads.
pub static OTHER_MOTORS: Rule = Rule {
    id: "sizing.panel.other_motors",
    gives: "I_o",
    form: Form::Sum,
    source: &NEC,
    clause: "409.21(C), 430.62(A)",
    known: Known::Read,
};

/// The branch device worked for the type of the main device, under the drive's own limit.
pub static BRANCH_FOR_MAIN: Rule = Rule {
    id: "sizing.panel.branch_for_main",
    gives: "I_b",
    form: Form::Choice,
    source: &NEC,
    clause: "430.62(A), 430.52(C)(1)",
    known: Known::Read,
};

/// A branch device entered below what the rule permits.
pub static BRANCH_PROVIDED: Rule = Rule {
    id: "sizing.panel.branch_provided",
    gives: "I_n",
    form: Form::Choice,
    source: &NEC,
    clause: "409.21(C)",
    known: Known::Read,
};

/// Largest branch device and the currents of the others.
pub static MAIN_SUM: Rule = Rule {
    id: "sizing.panel.main_sum",
    gives: "I_x",
    form: Form::Formula {
        expression: "I_b + I_o",
        symbols: &["I_b", "I_o"],
    },
    source: &NEC,
    clause: "409.21(C)",
    known: Known::Read,
};

/// The largest standard rating not above the sum.
pub static MAIN_LARGEST: Rule = Rule {
    id: "sizing.panel.main_largest",
    gives: "I_n",
    form: Form::Lookup,
    source: &NEC,
    clause: "409.21(C), 240.6(A)",
    known: Known::Read,
};

/// Loss of a drive without data.
pub static DRIVE_HEAT_ASSUMED: Rule = Rule {
    id: "physics.heat.drive_loss_by_motor",
    gives: "P_d",
    form: Form::Formula {
        expression: "p * P_m + P_c",
        symbols: &["p", "P_m", "P_c"],
    },
    source: &TRADE,
    clause: "3 per cent of motor power and 30 W for its control",
    known: Known::CrossChecked,
};

/// The part of a loss which stays in the enclosure.
pub static HEAT_KEPT_INSIDE: Rule = Rule {
    id: "physics.heat.kept_inside",
    gives: "P",
    form: Form::Formula {
        expression: "P_d * (1 - h)",
        symbols: &["P_d", "h"],
    },
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Largest loss of a pole at its rating.
pub static BREAKER_LOSS_LIMIT: Rule = Rule {
    id: "sizing.heat.breaker_limit",
    gives: "P_n",
    form: Form::Lookup,
    source: &IEC_60898_1,
    clause: "table of maximum power loss for each pole",
    known: Known::FromMemory,
};

/// Largest loss of a fuse link at its rating.
pub static FUSE_LOSS_LIMIT: Rule = Rule {
    id: "sizing.heat.fuse_limit",
    gives: "P_n",
    form: Form::Lookup,
    source: &IEC_60269_2,
    clause: "fuse system A, maximum power dissipation",
    known: Known::FromMemory,
};

/// Loss of a device without data.
pub static DEVICE_HEAT_ASSUMED: Rule = Rule {
    id: "physics.heat.loss_by_square_of_current",
    gives: "P",
    form: Form::Formula {
        expression: "n * P_n * (I / I_n) * (I / I_n)",
        symbols: &["n", "P_n", "I", "I_n"],
    },
    source: &PHYSICS,
    clause: "loss by the square of current, from its largest value",
    known: Known::CrossChecked,
};

/// Everything of a feeder which is inside.
pub static FEEDER_HEAT: Rule = Rule {
    id: "sizing.heat.feeder",
    gives: "P",
    form: Form::Sum,
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Conductors of a feeder inside.
pub static CONDUCTOR_HEAT: Rule = Rule {
    id: "sizing.heat.conductors",
    gives: "P",
    form: Form::Sum,
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Heat of a supply of known output and efficiency.
pub static SUPPLY_HEAT: Rule = Rule {
    id: "physics.heat.supply_loss",
    gives: "P",
    form: Form::Formula {
        expression: "P_out * (1 / eta - 1)",
        symbols: &["P_out", "eta"],
    },
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Sum of the heat ledger.
pub static LEDGER_SUM: Rule = Rule {
    id: "work.ledger.sum",
    gives: "P",
    form: Form::Sum,
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Effective surface by mounting.
pub static EFFECTIVE_SURFACE: Rule = Rule {
    id: "physics.heat.effective_surface",
    gives: "A",
    form: Form::Formula {
        expression: "b_t * W * D + (b_f + b_r) * W * H + b_s * D * H",
        symbols: &["b_t", "W", "D", "b_f", "b_r", "H", "b_s"],
    },
    source: &IEC_60890,
    clause: "effective cooling surface, as DIN VDE 0660-500 prints it",
    known: Known::CrossChecked,
};

/// Heat through all walls for a kelvin.
pub static WALL_CONDUCTANCE: Rule = Rule {
    id: "physics.heat.wall_conductance",
    gives: "G",
    form: Form::Formula {
        expression: "k * A",
        symbols: &["k", "A"],
    },
    source: &TRADE,
    clause: "wall coefficient of still air",
    known: Known::CrossChecked,
};

/// Rise of the air in a sealed enclosure.
pub static SEALED_RISE: Rule = Rule {
    id: "physics.heat.sealed_rise",
    gives: "dT",
    form: Form::Formula {
        expression: "P / G",
        symbols: &["P", "G"],
    },
    source: &TRADE,
    clause: "linear wall rule",
    known: Known::CrossChecked,
};

/// Temperature of the air in a sealed enclosure.
pub static SEALED_INSIDE: Rule = Rule {
    id: "physics.heat.sealed_inside",
    gives: "T_i",
    form: Form::Formula {
        expression: "T_a + dT",
        symbols: &["T_a", "dT"],
    },
    source: &PHYSICS,
    clause: "temperature and rise",
    known: Known::Derived,
};

/// Where a size step leaves no exact temperature, the warmer end.
pub static AIR_LOOP_END: Rule = Rule {
    id: "work.loop.warmer_end",
    gives: "T_i",
    form: Form::Choice,
    source: &PHYSICS,
    clause: "loop between air and sizes, its warmer end",
    known: Known::Derived,
};

/// Rise which the limit inside permits.
pub static PERMITTED_RISE: Rule = Rule {
    id: "physics.air.permitted_rise",
    gives: "dT",
    form: Form::Formula {
        expression: "T_i - T_a",
        symbols: &["T_i", "T_a"],
    },
    source: &PHYSICS,
    clause: "difference of two temperatures",
    known: Known::Derived,
};

/// Pressure of the air at the site.
pub static SITE_PRESSURE: Rule = Rule {
    id: "physics.air.site_pressure",
    gives: "p",
    form: Form::Formula {
        expression: "101325 * (1 - 0.0000225577 * z) ^ 5.25588",
        symbols: &["z"],
    },
    source: &STANDARD_ATMOSPHERE,
    clause: "pressure and altitude, also ISO 2533",
    known: Known::CrossChecked,
};

/// Density of the air at the inlet.
pub static AIR_DENSITY: Rule = Rule {
    id: "physics.air.density",
    gives: "rho",
    form: Form::Formula {
        expression: "p / (287.05 * T_a)",
        symbols: &["p", "T_a"],
    },
    source: &PHYSICS,
    clause: "gas law of dry air",
    known: Known::Derived,
};

/// Airflow at the inlet.
pub static AIRFLOW: Rule = Rule {
    id: "physics.air.airflow",
    gives: "V",
    form: Form::Formula {
        expression: "P / (rho * cp * dT)",
        symbols: &["P", "rho", "cp", "dT"],
    },
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Heat less what the walls take, never below nothing.
pub static HEAT_LEFT_FOR_AIR: Rule = Rule {
    id: "physics.air.heat_left",
    gives: "P_a",
    form: Form::Choice,
    source: &PHYSICS,
    clause: "conservation of energy",
    known: Known::Derived,
};

/// Airflow by the metric trade rule.
pub static AIRFLOW_METRIC_RULE: Rule = Rule {
    id: "physics.air.metric_rule",
    gives: "V",
    form: Form::Formula {
        expression: "3.1 * P / dT / 3600",
        symbols: &["P", "dT"],
    },
    source: &TRADE,
    clause: "V = 3.1 P / dT in cubic metres an hour, exact near 33 degrees Celsius at sea level",
    known: Known::CrossChecked,
};

/// Airflow by the US trade rule.
pub static AIRFLOW_US_RULE: Rule = Rule {
    id: "physics.air.us_rule",
    gives: "V",
    form: Form::Formula {
        expression: "3.16 * P / (1.8 * dT) * 0.3048 ^ 3 / 60",
        symbols: &["P", "dT"],
    },
    source: &TRADE,
    clause: "V = 3.16 P / dT in CFM and degrees Fahrenheit, exact near 21 degrees Celsius at sea level",
    known: Known::Read,
};

/// Every rule, in the order of the work.
pub fn all() -> Vec<&'static Rule> {
    vec![
        &MOTOR_TABLE_CURRENT,
        &DRIVE_INPUT_ASSUMED,
        &DRIVE_INPUT_AT_LEAST_MOTOR,
        &INPUT_AMPACITY,
        &OUTPUT_AMPACITY,
        &INSIDE_CELL,
        &FIELD_TERMINAL_CELL,
        &FIELD_INSULATION_CELL,
        &AMBIENT_FACTOR,
        &COUNT_FACTOR,
        &TERMINAL_AMPACITY,
        &CORRECTED_AMPACITY,
        &USABLE_AMPACITY,
        &CONDUCTOR_SIZE,
        &CONDUCTOR_ENTERED,
        &TABLE_9_RESISTANCE,
        &TABLE_9_REACTANCE,
        &REACTIVE_FACTOR,
        &VOLTAGE_DROP,
        &DROP_RATIO,
        &DROP_BOTH,
        &TABLE_8_RESISTANCE,
        &RUN_HEAT,
        &TIME_DELAY_PERCENTAGE,
        &NONTIME_DELAY_PERCENTAGE,
        &BREAKER_PERCENTAGE,
        &DEVICE_PRODUCT,
        &DEVICE_STANDARD,
        &DEVICE_CLASS_CC,
        &DEVICE_DRIVE_LIMIT,
        &DISCONNECT,
        &GROUNDING_TABLE,
        &TABLE_8_AREA,
        &GROUNDING_RATIO,
        &GROUNDING_AREA,
        &GROUNDING_SIZE,
        &DRIVE_APPARENT_POWER,
        &SOURCE_RATIO,
        &SOURCE_IMPEDANCE,
        &SOURCE_IMPEDANCE_BY_FAULT,
        &REACTOR_INDUCTANCE,
        &REACTOR_CURRENT,
        &REACTOR_HEAT_ASSUMED,
        &TRANSFORMER_CURRENT,
        &TRANSFORMER_FAULT,
        &FAULT_CONSTANT,
        &RUN_FACTOR,
        &RUN_MULTIPLIER,
        &FAULT_AT_PANEL,
        &RUNNING_CURRENT,
        &CONNECTED_CURRENT,
        &INCOMING_AMPACITY,
        &OTHER_INPUTS,
        &OTHER_MOTORS,
        &BRANCH_FOR_MAIN,
        &BRANCH_PROVIDED,
        &MAIN_SUM,
        &MAIN_LARGEST,
        &DRIVE_HEAT_ASSUMED,
        &HEAT_KEPT_INSIDE,
        &BREAKER_LOSS_LIMIT,
        &FUSE_LOSS_LIMIT,
        &DEVICE_HEAT_ASSUMED,
        &FEEDER_HEAT,
        &CONDUCTOR_HEAT,
        &SUPPLY_HEAT,
        &LEDGER_SUM,
        &EFFECTIVE_SURFACE,
        &WALL_CONDUCTANCE,
        &SEALED_RISE,
        &SEALED_INSIDE,
        &AIR_LOOP_END,
        &PERMITTED_RISE,
        &SITE_PRESSURE,
        &AIR_DENSITY,
        &AIRFLOW,
        &HEAT_LEFT_FOR_AIR,
        &AIRFLOW_METRIC_RULE,
        &AIRFLOW_US_RULE,
    ]
}
