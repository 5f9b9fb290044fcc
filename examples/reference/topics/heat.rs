//! Heat of parts, and heat through walls.

use super::{Answers, Gathered, Inputs, Topic, Work, given};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use std::sync::Arc;
use ventrail::physics::air::heat_left_for_air;
use ventrail::physics::heat::{
    drive_loss_by_motor, loss_by_square_of_current, reactor_loss_by_motor, run_loss, sealed_rise,
    wall_conductance,
};
use ventrail::quantity::{
    Area, HeatConductance, Kind, Length, Power, Ratio, ShaftPower, Temperature,
    TemperatureDifference, Transmittance,
};
use ventrail::sizing::air::{Air, AirInput, Walls, air_of};
use ventrail::sizing::heat::{drive_loss, source_heat};
use ventrail::sizing::rules;
use ventrail::tables::enclosure::Mounting;
use ventrail::working::{Field, Given};

const MOUNTINGS: &[&str] = &[
    "free",
    "against wall",
    "row end",
    "wall row end",
    "row middle",
    "wall row middle",
    "wall row middle covered",
];
const HEIGHT: Key = optional(
    "height",
    Takes::Measured(Kind::Length),
    "outside, where the area is left out",
);
const WIDTH: Key = optional(
    "width",
    Takes::Measured(Kind::Length),
    "outside, where the area is left out",
);
const DEPTH: Key = optional(
    "depth",
    Takes::Measured(Kind::Length),
    "outside, where the area is left out",
);
const MOUNTING: Key = optional(
    "mounting",
    Takes::Word(MOUNTINGS),
    "how the enclosure stands, else free",
);
const AREA: Key = optional(
    "area",
    Takes::Measured(Kind::Area),
    "effective surface, else by measures and mounting",
);
const COEFFICIENT: Key = needed(
    "coefficient",
    Takes::Measured(Kind::Transmittance),
    "wall coefficient k",
);
const HEAT: Key = needed("heat", Takes::Measured(Kind::Power), "heat inside");
const RISE: Key = needed(
    "rise",
    Takes::Measured(Kind::TemperatureDifference),
    "of the air inside over that outside",
);
const PATHS: Key = optional("paths", Takes::Count, "current paths in parallel, else 1");
const HEAT_GIVEN: Key = needed("heat", Takes::Measured(Kind::Power), "heat of all");

/// Heat.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "effective surface",
        about: "Effective cooling surface of an enclosure: sizing::air::air_of.",
        inputs: &[
            needed("height", Takes::Measured(Kind::Length), "outside"),
            needed("width", Takes::Measured(Kind::Length), "outside"),
            needed("depth", Takes::Measured(Kind::Length), "outside"),
            MOUNTING,
        ],
        expected: &[needed(
            "area",
            Takes::Measured(Kind::Area),
            "effective surface",
        )],
        work: Work::Now(|inputs| {
            Gathered::default()
                .quantity("area", Some(surface(inputs)?))
                .done()
        }),
    },
    Topic {
        name: "heat through walls",
        about: "Heat which the walls carry at a rise, and what is left: physics::heat::wall_conductance and physics::air::heat_left_for_air; the walls have the rest.",
        inputs: &[
            AREA,
            HEIGHT,
            WIDTH,
            DEPTH,
            MOUNTING,
            COEFFICIENT,
            RISE,
            HEAT,
        ],
        expected: &[
            needed("area", Takes::Measured(Kind::Area), "effective surface"),
            needed(
                "through_walls",
                Takes::Measured(Kind::Power),
                "heat through the walls",
            ),
            needed(
                "left",
                Takes::Measured(Kind::Power),
                "heat which is left for cooling",
            ),
        ],
        work: Work::Now(work_walls),
    },
    Topic {
        name: "sealed enclosure",
        about: "Air inside a sealed enclosure by the linear rule: sizing::air::air_of, or physics::heat::sealed_rise where the area is put in.",
        inputs: &[
            AREA,
            HEIGHT,
            WIDTH,
            DEPTH,
            MOUNTING,
            COEFFICIENT,
            HEAT,
            needed(
                "ambient",
                Takes::Measured(Kind::Temperature),
                "air around the enclosure",
            ),
        ],
        expected: &[
            needed(
                "rise",
                Takes::Measured(Kind::TemperatureDifference),
                "rise of the air inside",
            ),
            needed("inside", Takes::Measured(Kind::Temperature), "air inside"),
        ],
        work: Work::Now(work_sealed),
    },
    Topic {
        name: "surface needed",
        about: "Surface which a heat needs at a rise: physics::heat::sealed_rise turned round, by its rise with one square metre.",
        inputs: &[COEFFICIENT, HEAT, RISE],
        expected: &[needed(
            "area",
            Takes::Measured(Kind::Area),
            "effective surface",
        )],
        work: Work::Now(|inputs| {
            let rise: TemperatureDifference = inputs.measured("rise")?;
            let one = wall_conductance(inputs.measured("coefficient")?, Area::square_metres(1.0));
            let with_one = sealed_rise(inputs.measured("heat")?, one);
            // The rise falls as the surface grows.
            let area = Area::square_metres(with_one.to_kelvin() / rise.to_kelvin());
            Gathered::default().quantity("area", Some(area)).done()
        }),
    },
    Topic {
        name: "drive heat",
        about: "Heat of a drive by its motor: physics::heat::drive_loss_by_motor, or sizing::heat::drive_loss where no share is put in.",
        inputs: &[
            needed(
                "power",
                Takes::Measured(Kind::ShaftPower),
                "rated power of the motor",
            ),
            optional(
                "share",
                Takes::Measured(Kind::Ratio),
                "of that power, else that of the sheet with its control",
            ),
            optional(
                "control",
                Takes::Measured(Kind::Power),
                "heat of the control beside the share, else none",
            ),
        ],
        expected: &[HEAT_GIVEN],
        work: Work::Now(work_drive),
    },
    Topic {
        name: "reactor heat",
        about: "Heat of a reactor by the motor: physics::heat::reactor_loss_by_motor.",
        inputs: &[
            needed(
                "power",
                Takes::Measured(Kind::ShaftPower),
                "rated power of the motor",
            ),
            needed("share", Takes::Measured(Kind::Ratio), "of that power"),
        ],
        expected: &[HEAT_GIVEN],
        work: Work::Now(|inputs| {
            let heat = reactor_loss_by_motor(inputs.measured("share")?, inputs.measured("power")?);
            Gathered::default().quantity("heat", Some(heat)).done()
        }),
    },
    Topic {
        name: "supply heat",
        about: "Heat of a supply by output and efficiency: sizing::heat::source_heat.",
        inputs: &[
            needed("output", Takes::Measured(Kind::Power), "power given out"),
            needed("efficiency", Takes::Measured(Kind::Ratio), "of the supply"),
        ],
        expected: &[HEAT_GIVEN],
        work: Work::Now(|inputs| {
            let output = given(inputs.measured::<Power>("output")?);
            let heat = source_heat(
                None,
                Some(&output),
                &given(inputs.measured::<Ratio>("efficiency")?),
            );
            Gathered::default().given("heat", heat.as_ref()).done()
        }),
    },
    Topic {
        name: "heat of a run",
        about: "Heat of one of the three conductors of a run: a third of physics::heat::run_loss.",
        inputs: &[
            needed("current", Takes::Measured(Kind::Current), "line current"),
            needed(
                "resistance",
                Takes::Measured(Kind::ImpedancePerLength),
                "of one conductor, at its working temperature",
            ),
            needed("length", Takes::Measured(Kind::Length), "of the run"),
        ],
        expected: &[needed(
            "heat",
            Takes::Measured(Kind::Power),
            "of one conductor",
        )],
        work: Work::Now(|inputs| {
            let of_three = run_loss(
                inputs.measured("current")?,
                inputs.measured("resistance")?,
                inputs.measured("length")?,
                1,
            );
            let heat = Power::watts(of_three.to_watts() / 3.0);
            Gathered::default().quantity("heat", Some(heat)).done()
        }),
    },
    Topic {
        name: "heat by square of current",
        about: "Heat of current paths which is known at another current: physics::heat::loss_by_square_of_current.",
        inputs: &[
            PATHS,
            needed(
                "rated",
                Takes::Measured(Kind::Current),
                "current at which the heat is known",
            ),
            needed(
                "heat",
                Takes::Measured(Kind::Power),
                "of one path at that current",
            ),
            needed("current", Takes::Measured(Kind::Current), "of each path"),
        ],
        expected: &[HEAT_GIVEN],
        work: Work::Now(|inputs| {
            let heat = loss_by_square_of_current(
                inputs.count_or("paths", 1),
                inputs.measured("heat")?,
                inputs.measured("rated")?,
                inputs.measured("current")?,
            );
            Gathered::default().quantity("heat", Some(heat)).done()
        }),
    },
];

fn walls(inputs: &Inputs) -> Result<Walls, String> {
    let measure = |stem| inputs.measured::<Length>(stem).map(given);
    Ok(Walls {
        height: measure("height")?,
        width: measure("width")?,
        depth: measure("depth")?,
        mounting: mounting(inputs),
        coefficient: given(inputs.measured_or(
            "coefficient",
            Transmittance::watts_per_square_metre_kelvin(1.0),
        )),
    })
}

fn mounting(inputs: &Inputs) -> Mounting {
    let position = MOUNTINGS
        .iter()
        .position(|name| Some(*name) == inputs.word("mounting"));
    position
        .and_then(|position| Mounting::ALL.get(position).copied())
        .unwrap_or(Mounting::Free)
}

/// Walls and air of a sealed enclosure with these walls.
fn sealed(inputs: &Inputs, heat: Power, ambient: Temperature) -> Result<Air, String> {
    Ok(air_of(&AirInput {
        walls: Some(walls(inputs)?),
        heat: Arc::new(rules::LEDGER_SUM.figure(heat, Vec::new())),
        ambient: given(ambient),
        limit: given(ambient),
        altitude: given(Length::metres(0.0)),
        is_ventilated: false,
    }))
}

/// The surface as put in, else by measures and mounting.
fn surface(inputs: &Inputs) -> Result<Area, String> {
    if let Some(area) = inputs.maybe("area") {
        return Ok(area);
    }
    let air = sealed(inputs, Power::watts(0.0), Temperature::celsius(20.0))?;
    air.surface
        .and_then(|figure| figure.quantity())
        .ok_or_else(|| missing("area, or height, width and depth"))
}

fn conductance(inputs: &Inputs) -> Result<HeatConductance, String> {
    Ok(wall_conductance(
        inputs.measured("coefficient")?,
        surface(inputs)?,
    ))
}

fn work_walls(inputs: &Inputs) -> Result<Answers, String> {
    let (walls, rise) = (
        conductance(inputs)?,
        inputs.measured::<TemperatureDifference>("rise")?,
    );
    let heat: Power = inputs.measured("heat")?;
    let left = heat_left_for_air(heat, walls, rise);
    Gathered::default()
        .quantity("area", Some(surface(inputs)?))
        .quantity("through_walls", Some(heat - left))
        .quantity("left", Some(left))
        .done()
}

fn work_sealed(inputs: &Inputs) -> Result<Answers, String> {
    let (heat, ambient) = (
        inputs.measured::<Power>("heat")?,
        inputs.measured::<Temperature>("ambient")?,
    );
    let mut gathered = Gathered::default();
    if inputs.maybe::<Area>("area").is_some() {
        let rise = sealed_rise(heat, conductance(inputs)?);
        return gathered
            .quantity("rise", Some(rise))
            .quantity("inside", Some(ambient + rise))
            .done();
    }
    let air = sealed(inputs, heat, ambient)?;
    gathered
        .figure("rise", air.sealed_rise.as_ref())
        .figure("inside", air.sealed_inside.as_ref())
        .done()
}

/// The heat of a drive by its motor.
pub fn drive_heat(inputs: &Inputs) -> Result<Power, String> {
    let motor: ShaftPower = inputs.measured("power")?;
    if let Some(share) = inputs.maybe("share") {
        let control = inputs.measured_or("control", Power::watts(0.0));
        return Ok(drive_loss_by_motor(share, motor, control));
    }
    let motor = Given::entered(Field::MotorPower, motor);
    drive_loss(None, Some(&motor))
        .map(|loss| loss.value)
        .ok_or_else(|| missing("power"))
}

fn work_drive(inputs: &Inputs) -> Result<Answers, String> {
    Gathered::default()
        .quantity("heat", Some(drive_heat(inputs)?))
        .done()
}
