//! Heat of parts, and heat through walls by the linear rule.

use crate::quantity::{
    Area, Current, HeatConductance, ImpedancePerLength, Length, Power, Ratio, ShaftPower,
    TemperatureDifference, Transmittance,
};

/// Loss of a drive without data: a share of the motor's power, and a constant part for its control.
///
/// P = p * P_m + P_c; p share, P_m motor power, P_c control. Trade rule: 3 per cent and 30 W.
pub fn drive_loss_by_motor(share: Ratio, motor: ShaftPower, control: Power) -> Power {
    Power::watts(share.to_one() * motor.to_watts() + control.to_watts())
}

/// The part of a loss which stays inside: P = P_d * (1 - h); P_d loss, h share carried outside.
pub fn kept_inside(loss: Power, share_outside: Ratio) -> Power {
    Power::watts(loss.to_watts() * (1.0 - share_outside.to_one()))
}

/// Loss of a reactor without data, as a share of motor power: P = p * P_m. Trade rule: 0.5 per cent.
pub fn reactor_loss_by_motor(share: Ratio, motor: ShaftPower) -> Power {
    Power::watts(share.to_one() * motor.to_watts())
}

/// Loss of current paths in parallel which is known at one current: P = n * P_n * (I / I_n) * (I / I_n); n paths,
/// P_n loss of one at I_n, I real current.
pub fn loss_by_square_of_current(paths: u32, loss: Power, rated: Current, real: Current) -> Power {
    let load = real.to_amperes() / rated.to_amperes();
    Power::watts(f64::from(paths) * loss.to_watts() * load * load)
}

/// Heat of the three conductors of a run: P = 3 * I * I * R * L / n; I line current, R resistance of one conductor for
/// its length at working temperature, L length, n conductors in parallel for each phase.
pub fn run_loss(
    current: Current,
    resistance: ImpedancePerLength,
    length: Length,
    sets: u32,
) -> Power {
    let amperes = current.to_amperes();
    Power::watts(
        3.0 * amperes * amperes * resistance.to_ohms_per_metre() * length.to_metres()
            / f64::from(sets),
    )
}

/// Heat of a supply of known output and efficiency: P = P_out * (1 / eta - 1).
pub fn supply_loss(output: Power, efficiency: Ratio) -> Power {
    Power::watts(output.to_watts() * (1.0 / efficiency.to_one() - 1.0))
}

/// Outside measures of an enclosure.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Measures {
    /// Height.
    pub height: Length,
    /// Width.
    pub width: Length,
    /// Depth.
    pub depth: Length,
}

/// The factor b of each face, ratios.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FaceWeights {
    /// Top.
    pub top: Ratio,
    /// Front.
    pub front: Ratio,
    /// Rear.
    pub rear: Ratio,
    /// Left and right side together: the sum of their factors.
    pub sides: Ratio,
}

/// Effective surface of an enclosure.
///
/// A = b_top * W * D + (b_front + b_rear) * W * H + b_sides * D * H; b surface factors, W width, D depth, H height.
/// Source: IEC TR 60890, effective cooling surface.
pub fn effective_surface(measures: Measures, weights: FaceWeights) -> Area {
    let (h, w, d) = (
        measures.height.to_metres(),
        measures.width.to_metres(),
        measures.depth.to_metres(),
    );
    Area::square_metres(
        weights.top.to_one() * w * d
            + (weights.front.to_one() + weights.rear.to_one()) * w * h
            + weights.sides.to_one() * d * h,
    )
}

/// Heat through all walls for a temperature difference: G = k * A.
pub fn wall_conductance(coefficient: Transmittance, surface: Area) -> HeatConductance {
    coefficient * surface
}

/// Rise of the air in a sealed enclosure by the linear rule: dT = P / G; P heat, G conductance of the walls.
pub fn sealed_rise(heat: Power, conductance: HeatConductance) -> TemperatureDifference {
    heat / conductance
}
