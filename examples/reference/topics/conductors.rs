//! Conductors: ampacity, size, grounding conductor.

use super::{Answers, Gathered, Inputs, METALS, Topic, Work, column, conduit, given, metal};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use crate::reference::topics::devices::motor_current;
use ventrail::quantity::{Current, Kind, Length, Ratio, Temperature, Voltage};
use ventrail::sizing::conductor::{
    Conductors, Demand, RunInput, Surrounding, Terminal, demand_of, size_run,
};
use ventrail::sizing::grounding::grounding_of;
use ventrail::sizing::rules;
use ventrail::tables::Column;
use ventrail::tables::nec_conductors::{ambient_factor, ampacity_row};
use ventrail::working::Run;

/// Copper or aluminium.
pub const METAL: Key = optional("metal", Takes::Word(METALS), "else copper");
/// Conductors in parallel.
pub const SETS: Key = optional(
    "sets",
    Takes::Count,
    "conductors in parallel for each phase, else 1",
);
const INSULATION: Key = optional(
    "insulation",
    Takes::Measured(Kind::Temperature),
    "column of the insulation, else 90 degrees Celsius",
);
const TERMINAL: Key = optional(
    "terminal",
    Takes::Measured(Kind::Temperature),
    "mark at the terminals, 60 or 75 degrees Celsius, else none",
);
const AMBIENT: Key = optional(
    "ambient",
    Takes::Measured(Kind::Temperature),
    "air along the route, else 30 degrees Celsius",
);
const CARRYING: Key = optional(
    "carrying",
    Takes::Count,
    "current-carrying conductors in the raceway, else 3",
);
const PLACE: Key = optional(
    "place",
    Takes::Word(&["field", "inside"]),
    "in the field (NEC Table 310.16) or inside the enclosure (UL 508A Table 28.1), else field",
);
const AIR: Key = optional(
    "air",
    Takes::Measured(Kind::Temperature),
    "upper edge of the band of the air inside, for a run inside",
);

const SIZED: &[Key] = &[
    needed(
        "required",
        Takes::Measured(Kind::Current),
        "ampacity asked for",
    ),
    needed(
        "size",
        Takes::Size,
        "smallest size which satisfies every rule; none where none does",
    ),
    needed(
        "table",
        Takes::Measured(Kind::Current),
        "its cell in the column of the terminals",
    ),
    needed(
        "usable",
        Takes::Measured(Kind::Current),
        "what its conductors carry by both columns",
    ),
];

/// Conductors.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "ambient factor",
        about: "Factor of the air by NEC Table 310.15(B)(1)(1): tables::nec_conductors::ambient_factor.",
        inputs: &[
            needed(
                "insulation",
                Takes::Measured(Kind::Temperature),
                "60, 75 or 90 degrees Celsius",
            ),
            needed(
                "ambient",
                Takes::Measured(Kind::Temperature),
                "air along the route",
            ),
        ],
        expected: &[needed(
            "factor",
            Takes::Measured(Kind::Ratio),
            "none above the last band",
        )],
        work: Work::Now(work_ambient_factor),
    },
    Topic {
        name: "ampacity of a size",
        about: "Ampacity of a size in the field, NEC Table 310.16 with both corrections: sizing::conductor::size_run.",
        inputs: &[
            needed("size", Takes::Size, "the conductor"),
            METAL,
            SETS,
            INSULATION,
            TERMINAL,
            AMBIENT,
            CARRYING,
        ],
        expected: &[
            needed(
                "table",
                Takes::Measured(Kind::Current),
                "cell in the column of the insulation",
            ),
            needed(
                "ambient_factor",
                Takes::Measured(Kind::Ratio),
                "factor of the air",
            ),
            needed(
                "count_factor",
                Takes::Measured(Kind::Ratio),
                "factor of the conductors in one raceway",
            ),
            needed(
                "corrected",
                Takes::Measured(Kind::Current),
                "all conductors of a phase by their insulation",
            ),
            needed(
                "by_terminals",
                Takes::Measured(Kind::Current),
                "all conductors of a phase by the column of their terminals",
            ),
            needed(
                "usable",
                Takes::Measured(Kind::Current),
                "the smaller of the two",
            ),
        ],
        work: Work::Now(work_ampacity),
    },
    Topic {
        name: "drive input conductor",
        about: "Conductors ahead of a drive, NEC 430.122(A): sizing::conductor::demand_of and size_run.",
        inputs: &[
            needed(
                "drive_input",
                Takes::Measured(Kind::Current),
                "rated input current of the drive",
            ),
            PLACE,
            AIR,
            METAL,
            SETS,
            INSULATION,
            TERMINAL,
            AMBIENT,
            CARRYING,
        ],
        expected: SIZED,
        work: Work::Now(|inputs| {
            let current = given(inputs.measured("drive_input")?);
            sized(
                inputs,
                Run::Ahead,
                &demand_of(&rules::INPUT_AMPACITY, "I_in", &current),
            )
        }),
    },
    Topic {
        name: "motor conductor",
        about: "Conductors of one motor, NEC 430.22 and 430.122(B): sizing::conductor::demand_of and size_run.",
        inputs: &[
            optional(
                "motor",
                Takes::Measured(Kind::Current),
                "full-load current, else by power and supply",
            ),
            optional(
                "power",
                Takes::Measured(Kind::ShaftPower),
                "rated power, for NEC Table 430.250",
            ),
            optional(
                "supply",
                Takes::Measured(Kind::Voltage),
                "voltage between lines, for the same table",
            ),
            PLACE,
            AIR,
            METAL,
            SETS,
            INSULATION,
            TERMINAL,
            AMBIENT,
            CARRYING,
        ],
        expected: SIZED,
        work: Work::Now(|inputs| {
            let current = motor_current(inputs)?;
            sized(
                inputs,
                Run::Behind,
                &demand_of(&rules::OUTPUT_AMPACITY, "I_m", &current),
            )
        }),
    },
    Topic {
        name: "grounding conductor",
        about: "Equipment grounding conductor, NEC 250.122(A) and (B): sizing::grounding::grounding_of.",
        inputs: &[
            needed(
                "device",
                Takes::Measured(Kind::Current),
                "rating of the device ahead",
            ),
            needed(
                "from",
                Takes::Size,
                "smallest phase conductor by the ampacity rules",
            ),
            needed("to", Takes::Size, "installed phase conductor"),
            METAL,
        ],
        expected: &[
            needed("table", Takes::Size, "by NEC Table 250.122"),
            needed(
                "ratio",
                Takes::Measured(Kind::Ratio),
                "growth of the phase area, unrounded",
            ),
            needed(
                "area",
                Takes::Measured(Kind::CrossSection),
                "area which the growth asks for",
            ),
            needed("size", Takes::Size, "the conductor"),
        ],
        work: Work::Now(work_grounding),
    },
];

fn work_ambient_factor(inputs: &Inputs) -> Result<Answers, String> {
    let column = column(inputs, "insulation")?.ok_or_else(|| missing("insulation"))?;
    Gathered::default()
        .quantity(
            "factor",
            ambient_factor(inputs.measured("ambient")?, column),
        )
        .done()
}

/// The run which the inputs describe.
pub fn run_of(inputs: &Inputs, run: Run) -> Result<RunInput, String> {
    let surrounding = match inputs.word("place") {
        Some("inside") => Surrounding::Inside {
            air: inputs.maybe("air"),
        },
        _ => Surrounding::Field {
            ambient: given(inputs.measured_or("ambient", Temperature::celsius(30.0))),
            carrying: given(inputs.count_or("carrying", 3)),
        },
    };
    let terminal = match column(inputs, "terminal")? {
        None => Terminal::Unmarked,
        Some(Column::C60) => Terminal::Marked60,
        Some(Column::C75) => Terminal::Marked75,
        Some(Column::C90) => return Err("terminals are marked 60 or 75 degrees Celsius".to_owned()),
    };
    Ok(RunInput {
        run,
        surrounding,
        metal: given(metal(inputs)),
        sets: given(inputs.count_or("sets", 1)),
        size: None,
        insulation: given(column(inputs, "insulation")?.unwrap_or(Column::C90)),
        terminal: given(terminal),
        conduit: given(conduit(inputs)),
        length: inputs.maybe::<Length>("length").map(given),
        power_factor: given(inputs.measured_or("power_factor", Ratio::of_one(0.85))),
    })
}

/// Runs whose drop does not matter have no supply of their own.
const ANY_SUPPLY: Voltage = Voltage::volts(480.0);

/// The run, worked.
pub fn worked(input: &RunInput, demand: &Demand, supply: Voltage) -> Result<Conductors, String> {
    // The findings are compared nowhere here: they have tests of their own.
    let mut unheard = Vec::new();
    size_run(input, demand, &given(supply), &mut unheard)
        .ok_or_else(|| "the run could not be worked".to_owned())
}

fn sized(inputs: &Inputs, run: Run, demand: &Demand) -> Result<Answers, String> {
    let conductors = worked(&run_of(inputs, run)?, demand, ANY_SUPPLY)?;
    let usable = conductors.ampacity.as_ref();
    let mut gathered = Gathered::default();
    for cell in [&rules::FIELD_TERMINAL_CELL, &rules::INSIDE_CELL] {
        gathered.step("table", usable, cell.id);
    }
    gathered
        .figure("required", Some(&conductors.required))
        .size("size", conductors.smallest())
        .figure("usable", usable)
        .done()
}

/// The demand of a run which only has to carry `current`, without any addition.
pub fn bare_demand(current: Current) -> Demand {
    Demand {
        ampacity: std::sync::Arc::new(rules::INPUT_AMPACITY.figure(current, Vec::new())),
        plain: current,
        carried: given(current),
    }
}

fn work_ampacity(inputs: &Inputs) -> Result<Answers, String> {
    let input = RunInput {
        size: Some(inputs.size("size")?),
        ..run_of(inputs, Run::Behind)?
    };
    let conductors = worked(&input, &bare_demand(Current::amperes(1.0)), ANY_SUPPLY)?;
    let usable = conductors.ampacity.as_ref();
    Gathered::default()
        .step("table", usable, rules::FIELD_INSULATION_CELL.id)
        .step("ambient_factor", usable, rules::AMBIENT_FACTOR.id)
        .step("count_factor", usable, rules::COUNT_FACTOR.id)
        .step("corrected", usable, rules::CORRECTED_AMPACITY.id)
        .step("by_terminals", usable, rules::TERMINAL_AMPACITY.id)
        .figure("usable", usable)
        .done()
}

/// The growth is worked for phases of which `from` is the smallest that fits: they are asked for what `from` carries.
fn work_grounding(inputs: &Inputs) -> Result<Answers, String> {
    let (from, metal) = (inputs.size("from")?, metal(inputs));
    let carries = ampacity_row(from)
        .and_then(|row| row.ampacity(metal, Column::C75))
        .ok_or_else(|| "the table has no such phase conductor".to_owned())?;
    let run = run_of(inputs, Run::Behind)?;
    let input = RunInput {
        size: Some(inputs.size("to")?),
        terminal: given(Terminal::Marked75),
        ..run
    };
    let conductors = worked(&input, &bare_demand(carries), ANY_SUPPLY)?;
    if conductors.smallest() != Some(from) {
        return Err(format!(
            "{} is not the smallest size for what it carries",
            from.number()
        ));
    }
    let mut unheard = Vec::new();
    let grounding = grounding_of(
        &conductors,
        &given(inputs.measured("device")?),
        &mut unheard,
    );
    Gathered::default()
        .step("table", grounding.as_ref(), rules::GROUNDING_TABLE.id)
        .step("ratio", grounding.as_ref(), rules::GROUNDING_RATIO.id)
        .step("area", grounding.as_ref(), rules::GROUNDING_AREA.id)
        .figure("size", grounding.as_ref())
        .done()
}
