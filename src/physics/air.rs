//! Air: pressure and density at the site, and the flow which carries heat away.

use crate::math::power;
use crate::quantity::{
    AirFlow, Density, HeatConductance, Length, Power, Pressure, SpecificHeat, Temperature,
    TemperatureDifference,
};

/// Specific heat of air at constant pressure; hardly moves between -20 and 120 °C (0.8 %).
pub const SPECIFIC_HEAT: SpecificHeat = SpecificHeat::joules_per_kilogram_kelvin(1006.0);
/// Specific gas constant of dry air, J/(kg K).
pub const GAS_CONSTANT_J_PER_KG_K: f64 = 287.05;
/// Pressure at sea level.
pub const SEA_LEVEL_PRESSURE: Pressure = Pressure::pascals(101_325.0);
/// Lapse of the standard atmosphere over its sea-level temperature, 1/m.
pub const LAPSE_PER_METRE: f64 = 2.25577e-5;
/// Exponent of the standard atmosphere's pressure.
pub const PRESSURE_EXPONENT: f64 = 5.255_88;

/// Pressure of the standard atmosphere at an altitude.
///
/// p = 101325 * (1 - 2.25577e-5 * z) ^ 5.25588; z height above sea level in metres, pascals. Valid to 11 km.
/// Source: US Standard Atmosphere 1976 (ISO 2533).
pub fn site_pressure(altitude: Length) -> Pressure {
    Pressure::pascals(
        SEA_LEVEL_PRESSURE.to_pascals()
            * power(
                1.0 - LAPSE_PER_METRE * altitude.to_metres(),
                PRESSURE_EXPONENT,
            ),
    )
}

/// Density of dry air at the site's pressure and its actual temperature: rho = p / (287.05 * T), T absolute.
///
/// Leaves out humidity, which makes air about 1 per cent lighter, 2 in hot humid rooms.
pub fn dry_air_density(pressure: Pressure, temperature: Temperature) -> Density {
    Density::kilograms_per_cubic_metre(
        pressure.to_pascals() / (GAS_CONSTANT_J_PER_KG_K * temperature.to_kelvin()),
    )
}

/// Airflow which carries a heat away at a rise, counted where the air has this density.
///
/// V = P / (rho * cp * dT); P heat, rho density at the fan, cp specific heat, dT rise between inlet and outlet.
pub fn airflow(heat: Power, density: Density, rise: TemperatureDifference) -> AirFlow {
    AirFlow::cubic_metres_per_second(
        heat.to_watts()
            / (density.to_kilograms_per_cubic_metre()
                * SPECIFIC_HEAT.to_joules_per_kilogram_kelvin()
                * rise.to_kelvin()),
    )
}

/// Heat which is left for the air when the walls take their share at the same rise: P = P_i - G * dT, never below zero.
pub fn heat_left_for_air(
    heat: Power,
    conductance: HeatConductance,
    rise: TemperatureDifference,
) -> Power {
    Power::watts((heat - conductance * rise).to_watts().max(0.0))
}

/// Airflow by the metric trade rule: V = 3.1 * P / dT, cubic metres an hour for watts and kelvin.
///
/// Exact for dry sea-level air near 33 °C.
pub fn airflow_by_metric_rule(heat: Power, rise: TemperatureDifference) -> AirFlow {
    AirFlow::cubic_metres_per_hour(3.1 * heat.to_watts() / rise.to_kelvin())
}

/// Airflow by the US trade rule: V = 3.16 * P / dT, cubic feet a minute for watts and degrees Fahrenheit.
///
/// Exact for dry sea-level air near 21 °C.
pub fn airflow_by_us_rule(heat: Power, rise: TemperatureDifference) -> AirFlow {
    AirFlow::cubic_feet_per_minute(3.16 * heat.to_watts() / rise.to_fahrenheit_degrees())
}
