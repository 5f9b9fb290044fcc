//! Voltage drop of a run.

use super::conductors::{METAL, SETS, bare_demand, run_of, worked};
use super::{Answers, CONDUITS, Gathered, Inputs, Topic, Work};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use ventrail::physics::circuit::{DropRun, voltage_drop};
use ventrail::quantity::{CrossSection, ImpedancePerLength, Kind, Ratio, Voltage};
use ventrail::sizing::conductor::RunInput;
use ventrail::tables::nec_chapter_9::size_of_area;
use ventrail::working::Run;

const CONDUIT: Key = optional("conduit", Takes::Word(CONDUITS), "else steel");
const CURRENT: Key = needed("current", Takes::Measured(Kind::Current), "line current");
const LENGTH: Key = needed("length", Takes::Measured(Kind::Length), "length one way");

/// Voltage drop.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "voltage drop by table",
        about: "Drop of a three-phase run by NEC Chapter 9, Table 9: sizing::conductor::size_run.",
        inputs: &[
            CURRENT,
            LENGTH,
            needed(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines",
            ),
            needed("size", Takes::Size, "the conductor"),
            METAL,
            SETS,
            CONDUIT,
            optional("power_factor", Takes::Measured(Kind::Ratio), "else 0.85"),
        ],
        expected: &[
            needed(
                "drop",
                Takes::Measured(Kind::Voltage),
                "drop between lines; none where the table has no row",
            ),
            needed(
                "share",
                Takes::Measured(Kind::Ratio),
                "the same as a share of the supply voltage",
            ),
        ],
        work: Work::Now(work_drop_by_table),
    },
    Topic {
        name: "voltage drop by ohms",
        about: "Drop of a three-phase run of known impedance: physics::circuit::voltage_drop.",
        inputs: &[
            CURRENT,
            LENGTH,
            SETS,
            needed(
                "resistance",
                Takes::Measured(Kind::ImpedancePerLength),
                "of one conductor",
            ),
            optional(
                "reactance",
                Takes::Measured(Kind::ImpedancePerLength),
                "of one conductor, else none",
            ),
            optional(
                "power_factor",
                Takes::Measured(Kind::Ratio),
                "else 1, with which the resistance may be an effective impedance",
            ),
            optional(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines, for the share",
            ),
        ],
        expected: &[
            needed("drop", Takes::Measured(Kind::Voltage), "drop between lines"),
            needed(
                "share",
                Takes::Measured(Kind::Ratio),
                "the same as a share of the supply voltage",
            ),
        ],
        work: Work::Now(work_drop_by_ohms),
    },
    Topic {
        name: "area for a voltage drop",
        about: "Smallest area which keeps a drop of a three-phase run by the constant K: physics::circuit::voltage_drop turned round, by its drop with one circular mil.",
        inputs: &[
            CURRENT,
            LENGTH,
            needed(
                "k_ohm_cmil_per_ft",
                Takes::Number,
                "the constant K of the metal",
            ),
            needed(
                "drop",
                Takes::Measured(Kind::Voltage),
                "drop between lines which is allowed",
            ),
        ],
        expected: &[
            needed(
                "area",
                Takes::Measured(Kind::CrossSection),
                "area asked for",
            ),
            needed("size", Takes::Size, "smallest size which has it"),
        ],
        work: Work::Now(work_area_for_drop),
    },
];

fn work_drop_by_table(inputs: &Inputs) -> Result<Answers, String> {
    let input = RunInput {
        size: Some(inputs.size("size")?),
        ..run_of(inputs, Run::Behind)?
    };
    let demand = bare_demand(inputs.measured("current")?);
    let conductors = worked(&input, &demand, inputs.measured("supply")?)?;
    Gathered::default()
        .figure("drop", conductors.drop.as_ref())
        .figure("share", conductors.drop_ratio.as_ref())
        .done()
}

fn work_drop_by_ohms(inputs: &Inputs) -> Result<Answers, String> {
    let drop = voltage_drop(
        inputs.measured("current")?,
        inputs.measured_or("power_factor", Ratio::of_one(1.0)),
        DropRun {
            resistance: inputs.measured("resistance")?,
            reactance: inputs.measured_or("reactance", ImpedancePerLength::ohms_per_metre(0.0)),
            length: inputs.measured("length")?,
            sets: inputs.count_or("sets", 1),
        },
    );
    let share = inputs
        .maybe::<Voltage>("supply")
        .map(|supply| drop / supply);
    Gathered::default()
        .quantity("drop", Some(drop))
        .quantity("share", share)
        .done()
}

fn work_area_for_drop(inputs: &Inputs) -> Result<Answers, String> {
    let constant = inputs
        .number("k_ohm_cmil_per_ft")
        .ok_or_else(|| missing("k_ohm_cmil_per_ft"))?;
    let allowed: Voltage = inputs.measured("drop")?;
    let thousand_feet = 1000.0;
    let with_one_mil = voltage_drop(
        inputs.measured("current")?,
        Ratio::of_one(1.0),
        DropRun {
            // K is the resistance of one foot of one circular mil.
            resistance: ImpedancePerLength::ohms_per_thousand_feet(thousand_feet * constant),
            reactance: ImpedancePerLength::ohms_per_metre(0.0),
            length: inputs.measured("length")?,
            sets: 1,
        },
    );
    // The drop falls as the area grows.
    let wanted = CrossSection::circular_mils((with_one_mil / allowed).to_one());
    Gathered::default()
        .quantity("area", Some(wanted))
        .size("size", size_of_area(wanted))
        .done()
}
