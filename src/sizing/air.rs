//! Where the heat goes: walls and air.

use crate::physics::air::{
    SPECIFIC_HEAT, airflow, airflow_by_metric_rule, airflow_by_us_rule, dry_air_density,
    heat_left_for_air, site_pressure,
};
use crate::physics::heat::{
    FaceWeights, Measures, effective_surface, sealed_rise, wall_conductance,
};
use crate::quantity::{
    Density, HeatConductance, Length, Power, Pressure, Ratio, Temperature, TemperatureDifference,
    Transmittance,
};
use crate::sizing::rules;
use crate::tables::enclosure::Mounting;
use crate::working::{Figure, Given, Term};
use std::sync::Arc;

/// Temperature and airflow of the enclosure, worked. `None` where something is missing.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Air {
    /// Effective surface.
    pub surface: Option<Arc<Figure>>,
    /// Effective surface times wall coefficient.
    pub conductance: Option<Arc<Figure>>,
    /// Rise of the sealed enclosure.
    pub sealed_rise: Option<Arc<Figure>>,
    /// Temperature inside when sealed.
    pub sealed_inside: Option<Arc<Figure>>,
    /// The temperature inside by which the sheet goes: sealed, or the chosen limit where fans hold it.
    pub inside: Option<Given<Temperature>>,
    /// Pressure of the site.
    pub pressure: Option<Arc<Figure>>,
    /// Density of the air at the inlet.
    pub density: Option<Arc<Figure>>,
    /// Airflow at the inlet which holds the limit, without credit for the walls.
    pub airflow: Option<Arc<Figure>>,
    /// The same with credit for the walls.
    pub airflow_credited: Option<Arc<Figure>>,
    /// By the metric trade rule.
    pub airflow_metric_rule: Option<Arc<Figure>>,
    /// By the US trade rule.
    pub airflow_us_rule: Option<Arc<Figure>>,
}

/// An enclosure as its walls see it.
#[derive(Debug, Clone, PartialEq)]
pub struct Walls {
    /// Height outside.
    pub height: Given<Length>,
    /// Width outside.
    pub width: Given<Length>,
    /// Depth outside.
    pub depth: Given<Length>,
    /// How it stands.
    pub mounting: Mounting,
    /// Wall coefficient.
    pub coefficient: Given<Transmittance>,
}

/// What warms and cools the air.
#[derive(Debug, Clone, PartialEq)]
pub struct AirInput {
    /// Walls, where all measures are known.
    pub walls: Option<Walls>,
    /// Heat inside, with that of the sun.
    pub heat: Arc<Figure>,
    /// Air around the enclosure, which is also what the fans take in.
    pub ambient: Given<Temperature>,
    /// Highest temperature allowed inside.
    pub limit: Given<Temperature>,
    /// Height of the site.
    pub altitude: Given<Length>,
    /// Whether fans blow air through.
    pub is_ventilated: bool,
}

/// Works walls and air for one heat.
///
/// With fans the inside is taken at the limit which they are to hold; sealed, at the rise of the linear rule. No airflow
/// is given where the limit is not above the inlet.
pub fn air_of(input: &AirInput) -> Air {
    let (surface, conductance) = input.walls.as_ref().map(conductance_of).unzip();
    let sealed = conductance
        .as_ref()
        .and_then(|conductance| sealed_of(input, conductance));
    let (sealed_rise, sealed_inside) = sealed.unzip();
    let inside = if input.is_ventilated {
        Some(input.limit.clone())
    } else {
        sealed_inside.as_ref().and_then(Given::from_figure)
    };
    let flows = flows_of(input, conductance.as_ref());
    Air {
        surface,
        conductance,
        sealed_rise,
        sealed_inside,
        inside,
        ..flows
    }
}

fn conductance_of(walls: &Walls) -> (Arc<Figure>, Arc<Figure>) {
    let factors = walls.mounting.factors();
    let sides = Ratio::of_one(factors.left.to_one() + factors.right.to_one());
    let area = effective_surface(
        Measures {
            height: walls.height.value,
            width: walls.width.value,
            depth: walls.depth.value,
        },
        FaceWeights {
            top: factors.top,
            front: factors.front,
            rear: factors.rear,
            sides,
        },
    );
    let surface = Arc::new(rules::EFFECTIVE_SURFACE.figure(
        area,
        [
            Term::constant("b_t", factors.top),
            walls.width.term("W"),
            walls.depth.term("D"),
            Term::constant("b_f", factors.front),
            Term::constant("b_r", factors.rear),
            walls.height.term("H"),
            Term::constant("b_s", sides),
        ],
    ));
    let conductance = rules::WALL_CONDUCTANCE.figure(
        wall_conductance(walls.coefficient.value, area),
        [walls.coefficient.term("k"), Term::of("A", &surface)],
    );
    (surface, Arc::new(conductance))
}

fn sealed_of(input: &AirInput, conductance: &Arc<Figure>) -> Option<(Arc<Figure>, Arc<Figure>)> {
    let heat: Power = input.heat.quantity()?;
    let walls: HeatConductance = conductance.quantity()?;
    let rise = sealed_rise(heat, walls);
    let rise_figure = Arc::new(rules::SEALED_RISE.figure(
        rise,
        [Term::of("P", &input.heat), Term::of("G", conductance)],
    ));
    let inside = rules::SEALED_INSIDE.figure(
        input.ambient.value + rise,
        [input.ambient.term("T_a"), Term::of("dT", &rise_figure)],
    );
    Some((rise_figure, Arc::new(inside)))
}

/// The airflows by every view; all `None` where the limit is not above the inlet.
fn flows_of(input: &AirInput, conductance: Option<&Arc<Figure>>) -> Air {
    let pressure: Pressure = site_pressure(input.altitude.value);
    let pressure_figure =
        Arc::new(rules::SITE_PRESSURE.figure(pressure, [input.altitude.term("z")]));
    let density: Density = dry_air_density(pressure, input.ambient.value);
    let density_figure = Arc::new(rules::AIR_DENSITY.figure(
        density,
        [Term::of("p", &pressure_figure), input.ambient.term("T_a")],
    ));
    let air = Air {
        pressure: Some(pressure_figure),
        density: Some(Arc::clone(&density_figure)),
        ..Air::default()
    };
    let rise: TemperatureDifference = input.limit.value - input.ambient.value;
    let Some(heat) = input
        .heat
        .quantity::<Power>()
        .filter(|_| rise.to_kelvin() >= SMALLEST_RISE.to_kelvin())
    else {
        return air;
    };
    let rise_figure = Arc::new(
        rules::PERMITTED_RISE.figure(rise, [input.limit.term("T_i"), input.ambient.term("T_a")]),
    );
    let exact = |heat_figure: &Arc<Figure>, heat: Power| {
        Arc::new(rules::AIRFLOW.figure(
            airflow(heat, density, rise),
            [
                Term::of("P", heat_figure),
                Term::of("rho", &density_figure),
                Term::constant("cp", SPECIFIC_HEAT),
                Term::of("dT", &rise_figure),
            ],
        ))
    };
    let heat_and_rise = || [Term::of("P", &input.heat), Term::of("dT", &rise_figure)];
    let credited = conductance.and_then(|conductance| {
        let left = heat_left_for_air(heat, conductance.quantity()?, rise);
        let left_figure = Arc::new(rules::HEAT_LEFT_FOR_AIR.figure(
            left,
            [
                Term::of("P", &input.heat),
                Term::of("G", conductance),
                Term::of("dT", &rise_figure),
            ],
        ));
        Some(exact(&left_figure, left))
    });
    Air {
        airflow: Some(exact(&input.heat, heat)),
        airflow_credited: credited,
        airflow_metric_rule: Some(Arc::new(
            rules::AIRFLOW_METRIC_RULE.figure(airflow_by_metric_rule(heat, rise), heat_and_rise()),
        )),
        airflow_us_rule: Some(Arc::new(
            rules::AIRFLOW_US_RULE.figure(airflow_by_us_rule(heat, rise), heat_and_rise()),
        )),
        ..air
    }
}

/// A rise below this is taken as none: no fan holds it, and its airflow would be no number worth reading.
pub const SMALLEST_RISE: TemperatureDifference = TemperatureDifference::kelvin(0.1);
