//! Air: pressure and density of a site, and the flow which carries heat.

use super::heat::drive_heat;
use super::{Answers, Gathered, Inputs, Topic, Work, given};
use crate::reference::keys::{Key, Takes, missing, needed, optional};
use std::sync::Arc;
use ventrail::physics::air::{
    SEA_LEVEL_PRESSURE, airflow, airflow_by_metric_rule, airflow_by_us_rule, dry_air_density,
    site_pressure,
};
use ventrail::quantity::{
    Density, Kind, Length, Power, Pressure, Temperature, TemperatureDifference,
};
use ventrail::sizing::air::{AirInput, air_of};
use ventrail::sizing::rules;

const HEAT: Key = needed(
    "heat",
    Takes::Measured(Kind::Power),
    "heat which the air carries",
);
const ALTITUDE: Key = needed(
    "altitude",
    Takes::Measured(Kind::Length),
    "of the site above the sea",
);
const RISE: Key = needed(
    "rise",
    Takes::Measured(Kind::TemperatureDifference),
    "of the air between inlet and outlet",
);

/// Air.
pub const TOPICS: &[Topic] = &[
    Topic {
        name: "air density",
        about: "Pressure of a site and density of dry air there: physics::air::site_pressure and dry_air_density.",
        inputs: &[
            ALTITUDE,
            needed(
                "temperature",
                Takes::Measured(Kind::Temperature),
                "of the air",
            ),
        ],
        expected: &[
            needed("pressure", Takes::Measured(Kind::Pressure), "of the site"),
            needed("density", Takes::Measured(Kind::Density), "of the air"),
        ],
        work: Work::Now(|inputs| {
            let pressure = site_pressure(inputs.measured("altitude")?);
            let density = dry_air_density(pressure, inputs.measured("temperature")?);
            Gathered::default()
                .quantity("pressure", Some(pressure))
                .quantity("density", Some(density))
                .done()
        }),
    },
    Topic {
        name: "airflow",
        about: "Air to be moved through an enclosure, no credit for the walls: sizing::air::air_of; mass and outlet volume by physics::air::airflow and dry_air_density.",
        inputs: &[
            HEAT,
            needed(
                "inlet",
                Takes::Measured(Kind::Temperature),
                "air around the enclosure",
            ),
            needed("outlet", Takes::Measured(Kind::Temperature), "air inside"),
            ALTITUDE,
        ],
        expected: &[
            needed("mass_flow_kg_s", Takes::Number, "mass of air for a second"),
            needed(
                "at_inlet",
                Takes::Measured(Kind::AirFlow),
                "volume with the density of the inlet",
            ),
            needed(
                "at_outlet",
                Takes::Measured(Kind::AirFlow),
                "volume with the density of the outlet",
            ),
            needed(
                "metric_rule",
                Takes::Measured(Kind::AirFlow),
                "by the metric trade rule",
            ),
            needed(
                "us_rule",
                Takes::Measured(Kind::AirFlow),
                "by the US trade rule",
            ),
        ],
        work: Work::Now(work_airflow),
    },
    Topic {
        name: "airflow at a density",
        about: "Air to be moved where it has a known density: physics::air::airflow.",
        inputs: &[
            HEAT,
            RISE,
            needed("density", Takes::Measured(Kind::Density), "of the air"),
        ],
        expected: &[needed(
            "flow",
            Takes::Measured(Kind::AirFlow),
            "volume with that density",
        )],
        work: Work::Now(|inputs| {
            let flow = airflow(
                inputs.measured("heat")?,
                inputs.measured("density")?,
                inputs.measured("rise")?,
            );
            Gathered::default().quantity("flow", Some(flow)).done()
        }),
    },
    Topic {
        name: "airflow by trade rule",
        about: "Air to be moved by the two trade rules: physics::air::airflow_by_metric_rule and airflow_by_us_rule.",
        inputs: &[
            optional(
                "heat",
                Takes::Measured(Kind::Power),
                "heat which the air carries, else that of a drive",
            ),
            optional(
                "power",
                Takes::Measured(Kind::ShaftPower),
                "rated power of the drive's motor",
            ),
            optional(
                "share",
                Takes::Measured(Kind::Ratio),
                "of that power which is heat",
            ),
            RISE,
        ],
        expected: &[
            needed(
                "metric_rule",
                Takes::Measured(Kind::AirFlow),
                "V = 3.1 P / dT in cubic metres an hour and kelvin",
            ),
            needed(
                "us_rule",
                Takes::Measured(Kind::AirFlow),
                "V = 3.16 P / dT in cubic feet a minute and degrees Fahrenheit",
            ),
        ],
        work: Work::Now(work_trade_rules),
    },
    Topic {
        name: "air mass flow",
        about: "Mass of air which carries a heat, the same at any density: that density times physics::air::airflow.",
        inputs: &[HEAT, RISE],
        expected: &[needed(
            "mass_flow_kg_s",
            Takes::Number,
            "mass of air for a second",
        )],
        work: Work::Now(|inputs| {
            let density = dry_air_density(SEA_LEVEL_PRESSURE, Temperature::celsius(20.0));
            let mass = mass_flow_kg_s(inputs.measured("heat")?, density, inputs.measured("rise")?);
            Gathered::default().number("mass_flow_kg_s", mass).done()
        }),
    },
    Topic {
        name: "airflow constant",
        about: "The constant C of V = C P / dT for air of a temperature and pressure: physics::air::airflow for one watt and one kelvin, with dry_air_density.",
        inputs: &[
            needed(
                "temperature",
                Takes::Measured(Kind::Temperature),
                "of the air",
            ),
            needed("pressure", Takes::Measured(Kind::Pressure), "of the air"),
        ],
        expected: &[
            needed(
                "constant_m3_per_h_k_per_w",
                Takes::Number,
                "C for cubic metres an hour, kelvin and watts",
            ),
            needed(
                "constant_cfm_degf_per_w",
                Takes::Number,
                "C for cubic feet a minute, degrees Fahrenheit and watts",
            ),
        ],
        work: Work::Now(work_constant),
    },
];

fn work_airflow(inputs: &Inputs) -> Result<Answers, String> {
    let heat: Power = inputs.measured("heat")?;
    let (inlet, outlet): (Temperature, Temperature) =
        (inputs.measured("inlet")?, inputs.measured("outlet")?);
    let altitude: Length = inputs.measured("altitude")?;
    let air = air_of(&AirInput {
        walls: None,
        heat: Arc::new(rules::LEDGER_SUM.figure(heat, Vec::new())),
        ambient: given(inlet),
        limit: given(outlet),
        altitude: given(altitude),
        is_ventilated: true,
    });
    let rise = outlet - inlet;
    let pressure: Option<Pressure> = air.pressure.as_ref().and_then(|figure| figure.quantity());
    let pressure = pressure.ok_or_else(|| missing("altitude"))?;
    let density = dry_air_density(pressure, outlet);
    Gathered::default()
        .number("mass_flow_kg_s", mass_flow_kg_s(heat, density, rise))
        .figure("at_inlet", air.airflow.as_ref())
        .quantity("at_outlet", Some(airflow(heat, density, rise)))
        .figure("metric_rule", air.airflow_metric_rule.as_ref())
        .figure("us_rule", air.airflow_us_rule.as_ref())
        .done()
}

/// Mass of the air which carries a heat: its volume with a density, times that density.
fn mass_flow_kg_s(heat: Power, density: Density, rise: TemperatureDifference) -> f64 {
    airflow(heat, density, rise).to_cubic_metres_per_second()
        * density.to_kilograms_per_cubic_metre()
}

fn work_trade_rules(inputs: &Inputs) -> Result<Answers, String> {
    let heat = match inputs.maybe("heat") {
        Some(heat) => heat,
        None => drive_heat(inputs)?,
    };
    let rise: TemperatureDifference = inputs.measured("rise")?;
    Gathered::default()
        .quantity("metric_rule", Some(airflow_by_metric_rule(heat, rise)))
        .quantity("us_rule", Some(airflow_by_us_rule(heat, rise)))
        .done()
}

fn work_constant(inputs: &Inputs) -> Result<Answers, String> {
    let density: Density = dry_air_density(
        inputs.measured("pressure")?,
        inputs.measured("temperature")?,
    );
    let one_kelvin = TemperatureDifference::kelvin(1.0);
    let constant = airflow(Power::watts(1.0), density, one_kelvin);
    Gathered::default()
        .number(
            "constant_m3_per_h_k_per_w",
            constant.to_cubic_metres_per_hour(),
        )
        .number(
            "constant_cfm_degf_per_w",
            constant.to_cubic_feet_per_minute() * one_kelvin.to_fahrenheit_degrees(),
        )
        .done()
}
