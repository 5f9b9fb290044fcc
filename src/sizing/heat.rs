//! Heat of the parts of a feeder, and of other sources.

use crate::physics::heat::{
    drive_loss_by_motor, kept_inside, loss_by_square_of_current, supply_loss,
};
use crate::quantity::{Current, Power, Ratio, ShaftPower};
use crate::sizing::rules;
use crate::tables::DeviceType;
use crate::tables::device_losses::{breaker_pole, fuse_link};
use crate::working::{Figure, Given, Rule, Term, sum_of_terms};
use std::sync::Arc;

/// The heat of a feeder's parts at full load. `None` where it could not be worked, or where there is no such part.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct FeederHeat {
    /// Loss of the drive in all: as entered, else assumed.
    pub drive: Option<Given<Power>>,
    /// The part of it which stays in the enclosure.
    pub drive_inside: Option<Arc<Figure>>,
    /// The entered reactor: its loss as entered, else assumed.
    pub reactor: Option<Given<Power>>,
    /// The branch device: as entered, else assumed.
    pub device: Option<Given<Power>>,
    /// Conductors inside.
    pub conductors: Option<Arc<Figure>>,
    /// Everything of this feeder inside.
    pub total: Option<Arc<Figure>>,
}

/// Share of motor power, and control power, of a drive without data.
const DRIVE_SHARE: Ratio = Ratio::per_cent(3.0);
const DRIVE_CONTROL: Power = Power::watts(30.0);

/// Loss of a drive: as entered, else 3 per cent of motor power and 30 W for its control, assumed.
pub fn drive_loss(
    entered: Option<Given<Power>>,
    motor: Option<&Given<ShaftPower>>,
) -> Option<Given<Power>> {
    entered.or_else(|| {
        let motor = motor?;
        let figure = rules::DRIVE_HEAT_ASSUMED.assumed_figure(
            drive_loss_by_motor(DRIVE_SHARE, motor.value, DRIVE_CONTROL),
            [
                Term::constant("p", DRIVE_SHARE),
                motor.term("P_m"),
                Term::constant("P_c", DRIVE_CONTROL),
            ],
        );
        Given::from_figure(&Arc::new(figure))
    })
}

/// The part of a drive's loss which stays inside. The share which a heatsink carries outside is of the whole loss.
pub fn loss_inside(loss: &Given<Power>, share_outside: &Given<Ratio>) -> Arc<Figure> {
    Arc::new(rules::HEAT_KEPT_INSIDE.figure(
        kept_inside(loss.value, share_outside.value),
        [loss.term("P_d"), share_outside.term("h")],
    ))
}

/// Loss of a three-pole device without data, assumed from the largest loss at its rating, by the square of current.
///
/// `None` where no limit is known for such a rating.
pub fn assumed_device_loss(
    device: DeviceType,
    rating: &Given<Current>,
    current: &Given<Current>,
) -> Option<Given<Power>> {
    let (limit, rule): (_, &'static Rule) = match device {
        DeviceType::InverseTimeBreaker => (breaker_pole(rating.value), &rules::BREAKER_LOSS_LIMIT),
        DeviceType::TimeDelayFuse | DeviceType::NontimeDelayFuse | DeviceType::ClassCcFuse => {
            (fuse_link(rating.value), &rules::FUSE_LOSS_LIMIT)
        }
    };
    let limit = limit?;
    let limit_figure = Arc::new(rule.figure(
        limit.loss,
        [rating.term("I_n"), Term::constant("up to", limit.up_to)],
    ));
    let figure = rules::DEVICE_HEAT_ASSUMED.assumed_figure(
        loss_by_square_of_current(POLES, limit.loss, rating.value, current.value),
        [
            Term::constant("n", POLES),
            Term::of("P_n", &limit_figure),
            current.term("I"),
            rating.term("I_n"),
        ],
    );
    Given::from_figure(&Arc::new(figure))
}

const POLES: u32 = 3;

/// Heat of another source: as entered, else from the output and efficiency of a supply.
pub fn source_heat(
    entered: Option<Given<Power>>,
    output: Option<&Given<Power>>,
    efficiency: &Given<Ratio>,
) -> Option<Given<Power>> {
    entered.or_else(|| {
        let output = output?;
        let figure = rules::SUPPLY_HEAT.figure(
            supply_loss(output.value, efficiency.value),
            [output.term("P_out"), efficiency.term("eta")],
        );
        Given::from_figure(&Arc::new(figure))
    })
}

/// The sum of several heats under one rule.
pub fn sum_of_heats(rule: &'static Rule, parts: Vec<Term>) -> Arc<Figure> {
    let watts = sum_of_terms(&parts);
    Arc::new(rule.figure(Power::watts(watts), parts))
}
