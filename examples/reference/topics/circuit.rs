//! Transformers and fault currents.

use super::{Answers, CONDUITS, Gathered, Inputs, METALS, Topic, Work, conduit, given, metal};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use ventrail::physics::circuit::{
    FaultRun, run_factor, run_multiplier, share_of, transformer_current, transformer_fault_current,
};
use ventrail::quantity::{ApparentPower, Current, Kind, Length, Ratio, Voltage};
use ventrail::sizing::fault::{FaultInput, FaultRunInput, fault_at_panel};
use ventrail::tables::fault_constants::fault_constant_row;

const POWER: Key = needed(
    "power",
    Takes::Measured(Kind::ApparentPower),
    "rated power of the transformer",
);
const VOLTAGE: Key = needed(
    "voltage",
    Takes::Measured(Kind::Voltage),
    "secondary voltage between lines",
);
const IMPEDANCE: Key = needed(
    "impedance",
    Takes::Measured(Kind::Ratio),
    "impedance of the transformer",
);
const COUNTED: Key = optional(
    "counted",
    Takes::Measured(Kind::Ratio),
    "share of the impedance which is counted, else 1",
);

/// Circuits.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "transformer current",
        about: "Full-load current of a three-phase transformer: physics::circuit::transformer_current.",
        inputs: &[POWER, VOLTAGE],
        expected: &[needed(
            "full_load",
            Takes::Measured(Kind::Current),
            "full-load current",
        )],
        work: Work::Now(|inputs| {
            Gathered::default()
                .quantity("full_load", Some(full_load(inputs)?))
                .done()
        }),
    },
    Topic {
        name: "transformer fault current",
        about: "Three-phase fault current at a transformer from an infinite bus: physics::circuit::transformer_fault_current.",
        inputs: &[POWER, VOLTAGE, IMPEDANCE, COUNTED],
        expected: &[
            needed(
                "full_load",
                Takes::Measured(Kind::Current),
                "full-load current",
            ),
            needed(
                "at_transformer",
                Takes::Measured(Kind::Current),
                "fault current",
            ),
        ],
        work: Work::Now(|inputs| {
            let full_load = full_load(inputs)?;
            Gathered::default()
                .quantity("full_load", Some(full_load))
                .quantity("at_transformer", Some(at_transformer(inputs, full_load)?))
                .done()
        }),
    },
    Topic {
        name: "fault current at the panel",
        about: "Largest three-phase fault current behind one run, point to point: sizing::fault::fault_at_panel, which counts 0.9 of a nameplate impedance.",
        inputs: &[
            VOLTAGE,
            optional(
                "power",
                Takes::Measured(Kind::ApparentPower),
                "rated power of the transformer, else start",
            ),
            optional(
                "impedance",
                Takes::Measured(Kind::Ratio),
                "impedance of the transformer, else start",
            ),
            optional(
                "impedance_is",
                Takes::Word(&["nameplate", "measured"]),
                "else nameplate",
            ),
            optional(
                "start",
                Takes::Measured(Kind::Current),
                "fault current at the start of the run, in place of the transformer",
            ),
            needed(
                "length",
                Takes::Measured(Kind::Length),
                "length of the run one way",
            ),
            needed("size", Takes::Size, "the conductor"),
            optional(
                "sets",
                Takes::Count,
                "conductors in parallel for each phase, else 1",
            ),
            optional("metal", Takes::Word(METALS), "else copper"),
            optional("conduit", Takes::Word(CONDUITS), "else steel"),
        ],
        expected: &[
            needed(
                "full_load",
                Takes::Measured(Kind::Current),
                "full-load current of the transformer",
            ),
            needed(
                "at_transformer",
                Takes::Measured(Kind::Current),
                "fault current at the start of the run",
            ),
            needed("factor", Takes::Measured(Kind::Ratio), "the factor f"),
            needed(
                "multiplier",
                Takes::Measured(Kind::Ratio),
                "the multiplier M",
            ),
            needed(
                "at_panel",
                Takes::Measured(Kind::Current),
                "fault current at the end of the run",
            ),
        ],
        work: Work::Now(work_panel),
    },
    Topic {
        name: "fault current along runs",
        about: "Three-phase fault currents behind several runs in a row, point to point: the functions of physics::circuit with the constants of tables::fault_constants.",
        inputs: &[
            VOLTAGE,
            optional(
                "power",
                Takes::Measured(Kind::ApparentPower),
                "rated power of the transformer, else start",
            ),
            optional(
                "impedance",
                Takes::Measured(Kind::Ratio),
                "impedance of the transformer, else start",
            ),
            COUNTED,
            optional(
                "start",
                Takes::Measured(Kind::Current),
                "fault current at the start of the first run, in place of the transformer",
            ),
            needed(
                "lengths",
                Takes::Several(Kind::Length),
                "lengths of the runs one way",
            ),
            needed("sizes", Takes::Sizes, "their conductors"),
            optional(
                "sets",
                Takes::Counts,
                "their conductors in parallel for each phase, else 1 each",
            ),
            optional("metal", Takes::Word(METALS), "else copper"),
            optional("conduit", Takes::Word(CONDUITS), "else steel"),
        ],
        expected: &[
            needed(
                "full_load",
                Takes::Measured(Kind::Current),
                "full-load current of the transformer",
            ),
            needed(
                "at_transformer",
                Takes::Measured(Kind::Current),
                "fault current at the start of the first run",
            ),
            needed(
                "constants",
                Takes::Several(Kind::LengthPerImpedance),
                "the constants C of the runs",
            ),
            needed(
                "factors",
                Takes::Several(Kind::Ratio),
                "the factors f of the runs",
            ),
            needed(
                "multipliers",
                Takes::Several(Kind::Ratio),
                "the multipliers M of the runs",
            ),
            needed(
                "ends",
                Takes::Several(Kind::Current),
                "fault currents at the ends of the runs",
            ),
        ],
        work: Work::Now(work_runs),
    },
];

fn full_load(inputs: &Inputs) -> Result<Current, String> {
    let power: ApparentPower = inputs.measured("power")?;
    Ok(transformer_current(power, inputs.measured("voltage")?))
}

fn at_transformer(inputs: &Inputs, full_load: Current) -> Result<Current, String> {
    let counted = inputs.measured_or("counted", Ratio::of_one(1.0));
    Ok(transformer_fault_current(
        full_load,
        inputs.measured("impedance")?,
        counted,
    ))
}

fn work_panel(inputs: &Inputs) -> Result<Answers, String> {
    let is_measured = inputs.word("impedance_is") == Some("measured");
    let at_source = inputs.maybe::<Current>("start").map(given);
    let impedance = match (&at_source, inputs.maybe::<Ratio>("impedance")) {
        (_, Some(impedance)) => impedance,
        // Not used where the current at the start of the run is put in.
        (Some(_), None) => Ratio::of_one(1.0),
        (None, None) => return Err(missing("impedance, or start")),
    };
    let input = FaultInput {
        voltage: given(inputs.measured::<Voltage>("voltage")?),
        at_source,
        transformer: inputs.maybe::<ApparentPower>("power").map(given),
        impedance: given(impedance),
        is_measured,
        run: Ok(FaultRunInput {
            size: inputs.size("size")?,
            metal: metal(inputs),
            conduit: conduit(inputs),
            sets: given(inputs.count_or("sets", 1)),
            length: given(inputs.measured::<Length>("length")?),
        }),
    };
    let fault = fault_at_panel(&input, &mut Vec::new());
    Gathered::default()
        .figure("full_load", fault.transformer_current.as_ref())
        .given("at_transformer", fault.at_source.as_ref())
        .figure("factor", fault.run_factor.as_ref())
        .figure("multiplier", fault.multiplier.as_ref())
        .given("at_panel", fault.at_panel.as_ref())
        .done()
}

fn work_runs(inputs: &Inputs) -> Result<Answers, String> {
    let mut gathered = Gathered::default();
    let mut current = match inputs.maybe::<Current>("start") {
        Some(start) => start,
        None => {
            let full_load = full_load(inputs)?;
            let at_transformer = at_transformer(inputs, full_load)?;
            gathered
                .quantity("full_load", Some(full_load))
                .quantity("at_transformer", Some(at_transformer));
            at_transformer
        }
    };
    let (lengths, sizes) = (inputs.several::<Length>("lengths"), inputs.sizes("sizes"));
    let mut sets = inputs.counts("sets");
    if sets.is_empty() {
        sets = vec![1; sizes.len()];
    }
    if lengths.len() != sizes.len() || sets.len() != sizes.len() {
        return Err("lengths, sizes and sets differ in number".to_owned());
    }
    let voltage: Voltage = inputs.measured("voltage")?;
    let (mut constants, mut factors, mut multipliers, mut ends) = (vec![], vec![], vec![], vec![]);
    for ((length, size), sets) in lengths.into_iter().zip(sizes).zip(sets) {
        let (constant, _) = fault_constant_row(size)
            .and_then(|row| row.constant(metal(inputs), conduit(inputs)))
            .ok_or_else(|| format!("the table has no constant for {}", size.number()))?;
        let run = FaultRun {
            constant,
            length,
            sets,
        };
        let factor = run_factor(current, voltage, run);
        let multiplier = run_multiplier(factor);
        current = share_of(multiplier, current);
        constants.push(constant);
        factors.push(factor);
        multipliers.push(multiplier);
        ends.push(current);
    }
    gathered
        .numbers("constants", &constants)
        .numbers("factors", &factors)
        .numbers("multipliers", &multipliers)
        .numbers("ends", &ends)
        .done()
}
