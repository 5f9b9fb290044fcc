//! The enclosure: its air for a ledger, and the loop between the air inside and the sizes.

use super::{Ledger, WorkedEnclosure};
use crate::assume::SheetInputs;
use crate::quantity::{AirFlow, Power, Ratio, Temperature};
use crate::sizing::air::{Air, AirInput, SMALLEST_RISE, Walls, air_of};
use crate::tables::nec_conductors::AMBIENT_BANDS;
use crate::working::{Field, Figure, Given, Grade, MarginNote, NoteKind};
use std::sync::Arc;

/// Works walls and air for what runs together and for everything connected.
pub(super) fn enclosure_of(inputs: &SheetInputs, ledger: &Ledger) -> WorkedEnclosure {
    let air_for = |heat: &Arc<Figure>| air_of(&air_input(inputs, heat));
    WorkedEnclosure {
        is_ventilated: inputs.enclosure.is_ventilated,
        ambient: inputs.site.ambient.clone(),
        limit: inputs.enclosure.limit.clone(),
        air: air_for(&ledger.running),
        air_connected: air_for(&ledger.connected),
    }
}

fn air_input(inputs: &SheetInputs, heat: &Arc<Figure>) -> AirInput {
    let enclosure = &inputs.enclosure;
    AirInput {
        walls: enclosure
            .measures
            .clone()
            .map(|[height, width, depth]| Walls {
                height,
                width,
                depth,
                mounting: enclosure.mounting,
                coefficient: enclosure.coefficient.clone(),
            }),
        heat: Arc::clone(heat),
        ambient: inputs.site.ambient.clone(),
        limit: enclosure.limit.clone(),
        altitude: inputs.altitude.clone(),
        is_ventilated: enclosure.is_ventilated,
    }
}

/// The upper edge of the band of Table 310.15(B)(1)(1) in which `air` lies: sizes inside hold for the whole band.
/// Air at or below 30 °C is one band, since Table 28.1 stands for it as printed; air beyond the table keeps its own
/// temperature, for which no insulation fits.
pub(super) fn band_of(air: Temperature) -> Temperature {
    band_edges()
        .find(|edge| crate::math::reaches(edge.to_kelvin(), air.to_kelvin()))
        .unwrap_or(air)
}

/// The edges of the bands from 30 °C up, coolest first.
pub(super) fn band_edges() -> impl Iterator<Item = Temperature> + Clone {
    AMBIENT_BANDS
        .iter()
        .map(|band| band.up_to_celsius)
        .filter(|edge| *edge >= 30.0)
        .map(Temperature::celsius)
}

/// What the sheet must be told of its enclosure.
pub(super) fn note_enclosure(
    inputs: &SheetInputs,
    enclosure: &WorkedEnclosure,
    heat: Power,
    notes: &mut Vec<MarginNote>,
) {
    let mut tell = |grade, field, kind| notes.push(MarginNote::new(grade, field, kind));
    if inputs.enclosure.measures.is_none() && heat > Power::watts(0.0) {
        tell(
            Grade::Query,
            Field::EnclosureHeight,
            NoteKind::EnclosureUnknown,
        );
    }
    if inputs.enclosure.is_outdoors && inputs.enclosure.sun.is_none() {
        tell(Grade::Stop, Field::SunHeat, NoteKind::SunMissing);
    }
    let limit = enclosure.limit.value;
    if enclosure.is_ventilated {
        let ambient = enclosure.ambient.value;
        if (limit - ambient) < SMALLEST_RISE {
            tell(
                Grade::Stop,
                Field::InsideLimit,
                NoteKind::InsideNotWarmer { limit, ambient },
            );
        }
        note_airflow(inputs, &enclosure.air, notes);
    } else if let Some(inside) = &enclosure.air.inside
        && crate::math::reaches(limit.to_kelvin(), inside.value.to_kelvin())
    {
        // The printed wall coefficient is up to 12 per cent high at 10 K, and some 7 at 2 000 m.
        let rise = inside.value - enclosure.ambient.value;
        if (limit - inside.value).to_kelvin() < WALL_RULE_DOUBT.to_one() * rise.to_kelvin() {
            let kind = NoteKind::WallRuleNearLimit {
                inside: inside.value,
                limit,
            };
            tell(Grade::Query, Field::InsideLimit, kind);
        }
    } else if let Some(inside) = &enclosure.air.inside {
        tell(
            Grade::Stop,
            Field::InsideLimit,
            NoteKind::InsideAboveLimit {
                inside: inside.value,
                limit,
            },
        );
    }
}

/// The share of a sealed rise by which the linear wall rule may be short. Source: the first-principles balance of a
/// painted box gives 4.3 to 4.4 W/m2K at 5 K rise where the rule takes 5.5; at a height the films are weaker still.
const WALL_RULE_DOUBT: Ratio = Ratio::of_one(0.25);

fn note_airflow(inputs: &SheetInputs, air: &Air, notes: &mut Vec<MarginNote>) {
    let Some(figure) = &air.airflow else {
        return;
    };
    let Some(needed) = figure.quantity::<AirFlow>() else {
        return;
    };
    if needed <= AirFlow::cubic_metres_per_second(0.0) {
        return;
    }
    let field = Field::InstalledAirflow;
    let kind = match &inputs.enclosure.installed_airflow {
        None => NoteKind::AirflowUnknown { needed },
        Some(Given {
            value: installed, ..
        }) if *installed < needed => NoteKind::AirflowShort {
            installed: *installed,
            needed,
        },
        Some(_) => return,
    };
    let grade = match kind {
        NoteKind::AirflowShort { .. } => Grade::Stop,
        _ => Grade::Query,
    };
    notes.push(MarginNote::new(grade, field, kind).about(figure));
}
