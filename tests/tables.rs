//! Every table of `src/tables` holds what its publication prints: cell by cell, both ways, against `published/tables/`.
//!
//! The columns of a data file are those of its table, and four more: `ground` (`published`, `derived` or `from memory`),
//! `readings` (in how many publications the row was read), `source` and `place`. A blank cell is one which the table
//! leaves blank. Numbers must be the same but for the last bits which a change of unit costs.

#![allow(
    clippy::expect_used,
    clippy::panic,
    reason = "a data file which cannot be read is a mistake of this folder, to be seen at once"
)]

use std::collections::{BTreeMap, BTreeSet};
use std::fmt::Debug;
use std::fs;
use std::path::PathBuf;
use ventrail::physics::heat::{FaceWeights, Measures, effective_surface};
use ventrail::quantity::{Current, Length, Ratio, Temperature, Voltage, WireSize};
use ventrail::sizing::device::{DeviceInput, size_branch_device};
use ventrail::sizing::rules;
use ventrail::tables::device_losses::{
    BREAKER_POLES, FUSE_LINKS, LossLimit, breaker_pole, fuse_link,
};
use ventrail::tables::enclosure::{
    COVERED_SIDE, COVERED_TOP, EXPOSED_SIDE, EXPOSED_TOP, Mounting, WallMaterial, wall_coefficient,
};
use ventrail::tables::fault_constants::{FAULT_CONSTANT_ROWS, fault_constant_row};
use ventrail::tables::nec_chapter_9::{
    CONDUCTOR_ROWS, IMPEDANCE_ROWS, area, conductor_row, impedance_row, size_of_area,
};
use ventrail::tables::nec_conductors::{
    AMBIENT_BANDS, AMPACITY_ROWS, COUNT_BANDS, GROUNDING_ROWS, ambient_factor, ampacity_row,
    count_factor, grounding_conductor,
};
use ventrail::tables::nec_motors::{
    MOTOR_ROWS, MOTOR_ROWS_KNOWN, MotorVoltage, largest_ratio, motor_row,
};
use ventrail::tables::nec_ratings::{STANDARD_RATINGS, at_or_above, at_or_below, ratings};
use ventrail::tables::ul_508a::{INSIDE_ROWS, INSIDE_ROWS_KNOWN, inside_row};
use ventrail::tables::{Column, Conduit, DeviceType, Edition, Known, Metal};
use ventrail::working::{Field, Given, Rule};

const EDITION: Edition = Edition::Nec2023;

/// What the change from a table's unit to SI and back may cost.
const LAST_BITS: f64 = 1e-12;

#[test]
fn motor_currents_are_those_of_nec_table_430_250() {
    let file = table("nec-table-430-250");
    let mut found = Findings::of(&file);
    found.same_keys(
        "motor_hp",
        MOTOR_ROWS.map(|row| row.power.to_horsepower()).as_slice(),
    );
    for (printed, row) in file.rows.iter().zip(MOTOR_ROWS) {
        for voltage in MotorVoltage::ALL {
            let column = format!("at_{}v_a", voltage.voltage().to_volts());
            let current = row.current(voltage);
            found.cell(printed, &column, current.map(Current::to_amperes));
            // The lookup finds the very row, and refuses where the cell is blank.
            let looked_up = motor_row(row.power, voltage);
            found.same(
                printed,
                "row looked up",
                looked_up,
                current.map(|_| (row, true)),
            );
        }
        found.known(printed, MOTOR_ROWS_KNOWN);
    }
    found.rule_known(&rules::MOTOR_TABLE_CURRENT);
    found.verdict();
}

#[test]
fn supplies_serve_the_motor_voltages_of_nec_table_430_250_and_no_others() {
    let file = table("nec-table-430-250-supplies");
    let mut found = Findings::of(&file);
    found.same_keys(
        "motor_v",
        MotorVoltage::ALL
            .map(|voltage| voltage.voltage().to_volts())
            .as_slice(),
    );
    let band = |row: &Row| row.needed("supply_from_v")..=row.needed("supply_to_v");
    // Every half volt from 90 to 700 is served by the one column whose band holds it, or by none.
    for volts in (180..=1400).map(|half_volts| f64::from(half_volts) / 2.0) {
        let wanted = file.rows.iter().find(|row| band(row).contains(&volts));
        let got = MotorVoltage::serving(Voltage::volts(volts));
        if wanted.map(|row| row.needed("motor_v")) != got.map(|got| got.voltage().to_volts()) {
            found.say(format!("a supply of {volts} V is served by {got:?}"));
        }
    }
    found.verdict();
}

#[test]
fn device_percentages_are_those_of_nec_table_430_52_c_1() {
    let file = table("nec-table-430-52-c-1");
    let mut found = Findings::of(&file);
    found.same_words("device", &DEVICES.map(|(name, _)| name));
    for (printed, (_, device)) in file.rows.iter().zip(DEVICES) {
        let per_cent = largest_ratio(device).to_per_cent();
        found.cell(printed, "largest_per_cent_of_full_load", Some(per_cent));
    }
    for column in [
        &rules::TIME_DELAY_PERCENTAGE,
        &rules::NONTIME_DELAY_PERCENTAGE,
        &rules::BREAKER_PERCENTAGE,
    ] {
        found.rule_known(column);
    }
    found.verdict();
}

#[test]
fn next_ratings_up_are_those_which_a_handbook_prints_for_300_and_250_per_cent() {
    let file = table("nec-430-52-check-values");
    let mut found = Findings::of(&file);
    for printed in &file.rows {
        let motor = Current::amperes(printed.needed("motor_full_load_a"));
        for (column, device) in [
            ("nontime_delay_fuse_a", DeviceType::NontimeDelayFuse),
            ("inverse_time_breaker_a", DeviceType::InverseTimeBreaker),
        ] {
            let by_table = at_or_above(largest_ratio(device) * motor, device, EDITION);
            found.cell(printed, column, by_table.map(Current::to_amperes));
            let sized = sized_for(motor, device);
            found.cell(printed, column, sized.map(Current::to_amperes));
        }
    }
    found.verdict();
}

#[test]
fn standard_ratings_are_those_of_nec_240_6_a() {
    let file = table("nec-240-6-a");
    let mut found = Findings::of(&file);
    found.same_keys(
        "rating_a",
        STANDARD_RATINGS
            .map(|row| row.rating.to_amperes())
            .as_slice(),
    );
    for (column, device) in [
        ("fuse", DeviceType::TimeDelayFuse),
        ("fuse", DeviceType::NontimeDelayFuse),
        ("inverse_time_breaker_2023", DeviceType::InverseTimeBreaker),
    ] {
        let printed: Vec<f64> = file
            .rows
            .iter()
            .filter(|row| row.says_yes(column))
            .map(|row| row.needed("rating_a"))
            .collect();
        let listed: Vec<f64> = ratings(device, EDITION).map(Current::to_amperes).collect();
        if printed != listed {
            found.say(format!(
                "{device:?}: {column} prints {printed:?}, the code lists {listed:?}"
            ));
        }
        next_ratings_follow(&printed, device, &mut found);
    }
    found.rule_ground(&rules::DEVICE_STANDARD);
    found.rule_ground(&rules::MAIN_LARGEST);
    found.verdict();
}

/// Each printed rating is its own next one; a little above it the next one up is taken, a little below it the next one
/// down, and outside the list there is none.
fn next_ratings_follow(printed: &[f64], device: DeviceType, found: &mut Findings<'_>) {
    let above =
        |amperes: f64| at_or_above(Current::amperes(amperes), device, EDITION).map(amperes_of);
    let below =
        |amperes: f64| at_or_below(Current::amperes(amperes), device, EDITION).map(amperes_of);
    let before = std::iter::once(None).chain(printed.iter().copied().map(Some));
    let after = printed
        .iter()
        .copied()
        .skip(1)
        .map(Some)
        .chain(std::iter::once(None));
    for ((rating, before), after) in printed.iter().copied().zip(before).zip(after) {
        let (more, less) = (rating * 1.000_001, rating * 0.999_999);
        let got = [
            above(rating),
            below(rating),
            above(more),
            below(more),
            above(less),
            below(less),
        ];
        let wanted = [
            Some(rating),
            Some(rating),
            after,
            Some(rating),
            Some(rating),
            before,
        ];
        if got != wanted {
            found.say(format!(
                "{device:?} near {rating} A: got {got:?}, wanted {wanted:?}"
            ));
        }
    }
}

#[test]
fn ampacities_are_those_of_nec_table_310_16() {
    let file = table("nec-table-310-16");
    let mut found = Findings::of(&file);
    found.same_words("size", &AMPACITY_ROWS.map(|row| row.size.number()));
    for (printed, row) in file.rows.iter().zip(AMPACITY_ROWS) {
        for (metal, of_metal) in [(Metal::Copper, "cu"), (Metal::Aluminium, "al")] {
            for column in COLUMNS {
                let name = format!("{of_metal}_{}c_a", column.celsius());
                found.cell(
                    printed,
                    &name,
                    row.ampacity(metal, column).map(Current::to_amperes),
                );
            }
        }
        found.known(printed, row.known);
        found.same(printed, "row looked up", ampacity_row(row.size), Some(row));
    }
    found.verdict();
}

#[test]
fn ambient_factors_are_those_of_nec_table_310_15_b_1_1() {
    let file = table("nec-table-310-15-b-1-1");
    let mut found = Findings::of(&file);
    found.same_keys(
        "ambient_to_c",
        AMBIENT_BANDS.map(|band| band.up_to_celsius).as_slice(),
    );
    for (printed, band) in file.rows.iter().zip(AMBIENT_BANDS) {
        for (column, factor) in COLUMNS.into_iter().zip(band.factors) {
            let name = format!("factor_{}c", column.celsius());
            found.cell(printed, &name, factor);
            // At both printed edges of the band, and just above the lower neighbour's edge: between two bands the
            // hotter one.
            let to = printed.needed("ambient_to_c");
            let from = printed.number("ambient_from_c").unwrap_or(-40.0);
            for celsius in [from - 0.9, from, to] {
                let looked_up = ambient_factor(Temperature::celsius(celsius), column);
                found.cell(printed, &name, looked_up.map(Ratio::to_one));
            }
        }
    }
    for column in COLUMNS {
        let beyond = ambient_factor(Temperature::celsius(85.1), column);
        if beyond.is_some() {
            found.say(format!(
                "{column:?} has a factor beyond 85 °C, where the table ends"
            ));
        }
    }
    found.rule_known(&rules::AMBIENT_FACTOR);
    found.verdict();
}

#[test]
fn ambient_factors_follow_the_square_root_at_the_upper_edge_of_each_band() {
    let file = table("nec-table-310-15-b-1-1");
    let mut found = Findings::of(&file);
    for printed in &file.rows {
        for column in COLUMNS {
            let name = format!("factor_{}c", column.celsius());
            let limit = f64::from(column.celsius());
            let by_formula = ((limit - printed.needed("ambient_to_c")) / (limit - 30.0)).sqrt();
            // Printed to two decimals: half a unit of the last place, and the last bits.
            if let Some(factor) = printed.number(&name)
                && (factor - by_formula).abs() > 0.005 + LAST_BITS
            {
                found.say(format!(
                    "line {}, {name}: printed {factor}, by formula {by_formula}",
                    printed.line
                ));
            }
        }
    }
    found.verdict();
}

#[test]
fn count_factors_are_those_of_nec_table_310_15_c_1() {
    let file = table("nec-table-310-15-c-1");
    let mut found = Findings::of(&file);
    if file.rows.len() != COUNT_BANDS.len() {
        found.say(format!(
            "{} bands are printed, the code has {}",
            file.rows.len(),
            COUNT_BANDS.len()
        ));
    }
    for (printed, band) in file.rows.iter().zip(COUNT_BANDS) {
        found.cell(printed, "conductors_to", band.up_to.map(f64::from));
        found.cell(printed, "per_cent", Some(band.per_cent));
    }
    // Every count a raceway can hold, not only the edges.
    for carrying in 1..=500_u32 {
        let row = file.rows.iter().find(|row| {
            let most = row.number("conductors_to").unwrap_or(f64::INFINITY);
            row.needed("conductors_from") <= f64::from(carrying) && f64::from(carrying) <= most
        });
        match row {
            Some(row) => found.cell(row, "per_cent", Some(count_factor(carrying).to_per_cent())),
            None => found.say(format!("no printed band holds {carrying} conductors")),
        }
    }
    found.rule_known(&rules::COUNT_FACTOR);
    found.verdict();
}

#[test]
fn grounding_conductors_are_those_of_nec_table_250_122() {
    let file = table("nec-table-250-122");
    let mut found = Findings::of(&file);
    found.same_keys(
        "device_up_to_a",
        GROUNDING_ROWS.map(|row| row.device.to_amperes()).as_slice(),
    );
    let mut below = 0.0;
    for (printed, row) in file.rows.iter().zip(GROUNDING_ROWS) {
        let up_to = printed.needed("device_up_to_a");
        for (column, metal, size) in [
            ("cu_size", Metal::Copper, row.copper),
            ("al_size", Metal::Aluminium, row.aluminium),
        ] {
            found.word(printed, column, size.number());
            // The first row not below the device: at the edge of the row, and just above the edge before it.
            for device in [up_to, below + 0.01] {
                let looked_up = grounding_conductor(Current::amperes(device), metal);
                found.same(printed, column, looked_up, Some(size));
            }
        }
        below = up_to;
    }
    if let Some(size) = grounding_conductor(Current::amperes(below + 0.01), Metal::Copper) {
        found.say(format!(
            "a device above {below} A gets {size:?}, where the table ends"
        ));
    }
    found.rule_ground(&rules::GROUNDING_TABLE);
    found.verdict();
}

#[test]
fn areas_and_direct_current_resistances_are_those_of_nec_chapter_9_table_8() {
    let file = table("nec-chapter-9-table-8");
    let mut found = Findings::of(&file);
    found.same_words("size", &CONDUCTOR_ROWS.map(|row| row.size.number()));
    for (printed, row) in file.rows.iter().zip(CONDUCTOR_ROWS) {
        found.cell(printed, "area_cmil", Some(row.area.to_circular_mils()));
        found.cell(
            printed,
            "area_cmil",
            Some(area(row.size).to_circular_mils()),
        );
        for (column, metal) in [
            ("cu_dc_75c_ohm_per_kft", Metal::Copper),
            ("al_dc_75c_ohm_per_kft", Metal::Aluminium),
        ] {
            let resistance = row.resistance(metal).to_ohms_per_thousand_feet();
            found.cell(printed, column, Some(resistance));
        }
        found.same(printed, "row looked up", conductor_row(row.size), Some(row));
        found.same(
            printed,
            "size of its area",
            size_of_area(row.area),
            Some(row.size),
        );
    }
    found.rule_known(&rules::TABLE_8_RESISTANCE);
    found.rule_known(&rules::TABLE_8_AREA);
    found.verdict();
}

#[test]
fn sizes_above_table_8_have_the_area_of_their_name() {
    for size in WireSize::ALL {
        if conductor_row(size).is_none() {
            let thousands: f64 = size.number().parse().expect("a number of circular mils");
            let circular_mils = area(size).to_circular_mils();
            assert!(
                is_same(circular_mils, thousands * 1000.0),
                "{size:?} has {circular_mils}"
            );
        }
    }
}

#[test]
fn impedances_are_those_of_nec_chapter_9_table_9() {
    let file = table("nec-chapter-9-table-9");
    let mut found = Findings::of(&file);
    found.same_words("size", &IMPEDANCE_ROWS.map(|row| row.size.number()));
    for (printed, row) in file.rows.iter().zip(IMPEDANCE_ROWS) {
        for (metal, of_metal) in [(Metal::Copper, "cu"), (Metal::Aluminium, "al")] {
            for (conduit, of_conduit, x_of) in CONDUITS {
                let cell = row.impedance(metal, conduit);
                let resistance = cell.map(|cell| cell.resistance.to_ohms_per_thousand_feet());
                found.cell(
                    printed,
                    &format!("r_{of_metal}_{of_conduit}_ohm_per_kft"),
                    resistance,
                );
                if let Some(cell) = cell {
                    let reactance = cell.reactance.to_ohms_per_thousand_feet();
                    found.cell(printed, x_of, Some(reactance));
                }
            }
        }
        found.same(printed, "row looked up", impedance_row(row.size), Some(row));
    }
    found.rule_known(&rules::TABLE_9_RESISTANCE);
    found.rule_known(&rules::TABLE_9_REACTANCE);
    found.verdict();
}

/// The effective impedance which the table prints for a power factor of 0.85 follows from its own R and X, as far as the
/// rounding of all three goes: R and Z stand there with two digits, X with three decimals. (The widest gap, 5.2 per cent,
/// is 1 AWG copper in PVC.)
#[test]
fn printed_effective_impedances_follow_from_the_resistances_and_reactances() {
    let file = table("nec-chapter-9-table-9");
    let mut found = Findings::of(&file);
    let (cosphi, sinphi) = (0.85_f64, (1.0 - 0.85_f64 * 0.85).sqrt());
    let mut compared = 0;
    for printed in &file.rows {
        let size = WireSize::from_number(printed.text("size")).expect("a size of the scale");
        let row = impedance_row(size).expect("the row of a printed size");
        for (metal, of_metal) in [(Metal::Copper, "cu"), (Metal::Aluminium, "al")] {
            for (conduit, of_conduit, _) in CONDUITS {
                let Some(cell) = row.impedance(metal, conduit) else {
                    continue;
                };
                let (r, x) = (
                    cell.resistance.to_ohms_per_thousand_feet(),
                    cell.reactance.to_ohms_per_thousand_feet(),
                );
                let name = format!("z85_{of_metal}_{of_conduit}_ohm_per_kft");
                let z = printed.needed(&name);
                let allowed = half_a_unit_of_two_digits(r) * cosphi
                    + 5e-4 * sinphi
                    + half_a_unit_of_two_digits(z);
                let computed = r * cosphi + x * sinphi;
                compared += 1;
                if (computed - z).abs() > allowed {
                    found.say(format!(
                        "line {}, {name}: printed {z}, computed {computed}, allowed {allowed}",
                        printed.line
                    ));
                }
            }
        }
    }
    // 21 sizes of copper and 20 of aluminium in three conduits.
    assert_eq!(compared, (21 + 20) * 3);
    found.verdict();
}

#[test]
fn inside_ampacities_are_those_of_ul_508a_table_28_1() {
    let file = table("ul-508a-table-28-1");
    let mut found = Findings::of(&file);
    found.same_words("size", &INSIDE_ROWS.map(|row| row.size.number()));
    for (printed, row) in file.rows.iter().zip(INSIDE_ROWS) {
        for (name, column) in [("cu_60c_a", Column::C60), ("cu_75c_a", Column::C75)] {
            found.cell(printed, name, row.ampacity(column).map(Current::to_amperes));
        }
        found.same(
            printed,
            "90 °C, which the table has not",
            row.ampacity(Column::C90),
            None,
        );
        found.known(printed, INSIDE_ROWS_KNOWN);
        found.same(printed, "row looked up", inside_row(row.size), Some(row));
    }
    found.rule_known(&rules::INSIDE_CELL);
    found.verdict();
}

#[test]
fn fault_constants_are_those_of_the_point_to_point_method() {
    let file = table("point-to-point-constants");
    let mut found = Findings::of(&file);
    let metals = [("copper", Metal::Copper), ("aluminium", Metal::Aluminium)];
    let conduits: [(&str, &[Conduit]); 2] = [
        ("steel", &[Conduit::Steel]),
        ("nonmagnetic", &[Conduit::Pvc, Conduit::Aluminium]),
    ];
    let printed_sizes: Vec<&str> = file.rows.iter().map(|row| row.text("size")).collect();
    let expected_sizes: Vec<&str> = FAULT_CONSTANT_ROWS
        .iter()
        .flat_map(|row| [row.size.number(); 4])
        .collect();
    if printed_sizes != expected_sizes {
        found.say(format!(
            "sizes {printed_sizes:?} are printed, the code has {expected_sizes:?}"
        ));
    }
    for printed in &file.rows {
        let size = WireSize::from_number(printed.text("size")).expect("a size of the scale");
        let metal = named(&metals, printed.text("metal"));
        let row = fault_constant_row(size).expect("the row of a printed size");
        for conduit in named(&conduits, printed.text("conduit")) {
            let cell = row.constant(metal, *conduit);
            let constant = cell.map(|(constant, _)| constant.to_feet_per_ohm());
            found.cell(printed, "feet_per_ohm", constant);
            if let Some((_, known)) = cell {
                found.known(printed, known);
            }
        }
    }
    found.verdict();
}

#[test]
fn surface_factors_are_the_published_ones() {
    let file = table("surface-factors");
    let mut found = Findings::of(&file);
    let faces = [
        ("exposed top", EXPOSED_TOP),
        ("covered top", COVERED_TOP),
        ("exposed side", EXPOSED_SIDE),
        ("covered side", COVERED_SIDE),
    ];
    found.same_words("face", &faces.map(|(name, _)| name));
    for (printed, (_, factor)) in file.rows.iter().zip(faces) {
        found.cell(printed, "factor", Some(factor.to_one()));
    }
    found.verdict();
}

/// All seven formulas, by their coefficients, and each against the surface of three unlike boxes.
#[test]
fn effective_surfaces_are_those_of_the_seven_printed_formulas() {
    let file = table("surface-area-formulas");
    let mut found = Findings::of(&file);
    let mountings = [
        ("free", Mounting::Free),
        ("against wall", Mounting::AgainstWall),
        ("row end", Mounting::RowEnd),
        ("wall row end", Mounting::WallRowEnd),
        ("row middle", Mounting::RowMiddle),
        ("wall row middle", Mounting::WallRowMiddle),
        ("wall row middle covered", Mounting::WallRowMiddleCovered),
    ];
    assert_eq!(mountings.map(|(_, mounting)| mounting), Mounting::ALL);
    found.same_words("mounting", &mountings.map(|(name, _)| name));
    for (printed, (_, mounting)) in file.rows.iter().zip(mountings) {
        let factors = mounting.factors();
        let sides = factors.left.to_one() + factors.right.to_one();
        let of_faces = factors.front.to_one() + factors.rear.to_one();
        found.cell(printed, "of_width_times_height", Some(of_faces));
        found.cell(printed, "of_depth_times_height", Some(sides));
        found.cell(printed, "of_width_times_depth", Some(factors.top.to_one()));
        let [wh, dh, wd] = [
            "of_width_times_height",
            "of_depth_times_height",
            "of_width_times_depth",
        ]
        .map(|column| printed.needed(column));
        for (h, w, d) in [(2.0, 0.8, 0.6), (0.6, 1.2, 0.3), (1.8, 1.6, 0.5)] {
            let area = effective_surface(
                Measures {
                    height: Length::metres(h),
                    width: Length::metres(w),
                    depth: Length::metres(d),
                },
                FaceWeights {
                    top: factors.top,
                    front: factors.front,
                    rear: factors.rear,
                    sides: Ratio::of_one(sides),
                },
            )
            .to_square_metres();
            let by_formula = wh * w * h + dh * d * h + wd * w * d;
            if !is_same(area, by_formula) {
                found.say(format!(
                    "line {}: a box of {h} x {w} x {d} m has {area} m2, by formula {by_formula}",
                    printed.line
                ));
            }
        }
    }
    found.verdict();
}

#[test]
fn wall_coefficients_are_the_stated_ones() {
    let file = table("wall-coefficients");
    let mut found = Findings::of(&file);
    let materials = [
        ("painted", WallMaterial::Painted),
        ("bare metal", WallMaterial::BareMetal),
        ("plastic", WallMaterial::Plastic),
        ("double-walled", WallMaterial::DoubleWalled),
    ];
    found.same_words("material", &materials.map(|(name, _)| name));
    for (printed, (_, material)) in file.rows.iter().zip(materials) {
        let coefficient = wall_coefficient(material).to_watts_per_square_metre_kelvin();
        found.cell(printed, "k_w_per_m2k", Some(coefficient));
    }
    found.verdict();
}

#[test]
fn breaker_losses_are_those_of_iec_60898_1() {
    let file = table("iec-60898-1-pole-losses");
    let mut found = Findings::of(&file);
    losses_agree(&BREAKER_POLES, breaker_pole, &mut found);
    found.rule_known(&rules::BREAKER_LOSS_LIMIT);
    found.verdict();
}

#[test]
fn fuse_losses_are_those_of_iec_60269_2() {
    let file = table("iec-60269-2-link-losses");
    let mut found = Findings::of(&file);
    losses_agree(&FUSE_LINKS, fuse_link, &mut found);
    found.rule_known(&rules::FUSE_LOSS_LIMIT);
    found.verdict();
}

fn losses_agree(
    rows: &[LossLimit],
    look_up: fn(Current) -> Option<LossLimit>,
    found: &mut Findings<'_>,
) {
    let keys: Vec<f64> = rows.iter().map(|row| row.up_to.to_amperes()).collect();
    found.same_keys("up_to_a", &keys);
    let mut below = 0.0;
    for (printed, row) in found.file.rows.iter().zip(rows) {
        found.cell(printed, "loss_w", Some(row.loss.to_watts()));
        if let Some(above) = printed.number("above_a")
            && !is_same(above, below)
        {
            found.say(format!(
                "line {}: the band begins at {above} A, the one before ends at {below} A",
                printed.line
            ));
        }
        for rating in [below + 0.01, row.up_to.to_amperes()] {
            let looked_up = look_up(Current::amperes(rating));
            found.same(printed, "limit looked up", looked_up, Some(*row));
        }
        below = row.up_to.to_amperes();
    }
    if let Some(limit) = look_up(Current::amperes(below + 0.01)) {
        found.say(format!(
            "above {below} A the table ends, but the code gives {limit:?}"
        ));
    }
}

/// A data file without a comparison would prove nothing.
#[test]
fn every_data_file_is_compared() {
    let this = include_str!("tables.rs");
    let mut files = 0;
    for entry in fs::read_dir(folder()).expect("the folder of the tables") {
        let path = entry.expect("an entry of the folder").path();
        let name = path.file_stem().expect("a name").to_string_lossy();
        files += 1;
        assert!(
            this.contains(&format!("table(\"{name}\")")),
            "{} is compared with nothing",
            path.display()
        );
    }
    assert!(files > 0, "{} is empty", folder().display());
}

// --- what the tests share -------------------------------------------------------------------------------------------

const COLUMNS: [Column; 3] = [Column::C60, Column::C75, Column::C90];

/// Each conduit, its name in the heads of resistances, and the head of its reactance.
const CONDUITS: [(Conduit, &str, &str); 3] = [
    (Conduit::Pvc, "pvc", "x_pvc_or_al_ohm_per_kft"),
    (Conduit::Aluminium, "al", "x_pvc_or_al_ohm_per_kft"),
    (Conduit::Steel, "steel", "x_steel_ohm_per_kft"),
];

const DEVICES: [(&str, DeviceType); 4] = [
    ("time-delay fuse", DeviceType::TimeDelayFuse),
    ("nontime-delay fuse", DeviceType::NontimeDelayFuse),
    ("class cc fuse", DeviceType::ClassCcFuse),
    ("inverse time breaker", DeviceType::InverseTimeBreaker),
];

fn amperes_of(current: Current) -> f64 {
    current.to_amperes()
}

fn is_same(a: f64, b: f64) -> bool {
    (a - b).abs() <= LAST_BITS * a.abs().max(b.abs())
}

/// Half a unit of the second digit of a number.
fn half_a_unit_of_two_digits(number: f64) -> f64 {
    let mut unit = 0.1;
    while number >= unit * 100.0 {
        unit *= 10.0;
    }
    while number < unit * 10.0 {
        unit /= 10.0;
    }
    unit / 2.0
}

fn named<T: Copy>(names: &[(&str, T)], wanted: &str) -> T {
    names
        .iter()
        .find(|(name, _)| *name == wanted)
        .map(|(_, value)| *value)
        .unwrap_or_else(|| panic!("{wanted:?} is no name here"))
}

/// The rating of a branch device by the rules which the sheet uses, without a drive's limit.
fn sized_for(motor: Current, device: DeviceType) -> Option<Current> {
    let mut notes = Vec::new();
    let input = DeviceInput {
        device: Given::entered(Field::DeviceType, device),
        motor_current: Given::entered(Field::MotorCurrent, motor),
        drive_input: None,
        permitted: None,
        largest: None,
        rating: None,
    };
    let sized = size_branch_device(&input, EDITION, &mut notes);
    assert!(notes.is_empty(), "{notes:?}");
    sized.rating.map(|rating| rating.value)
}

fn folder() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/published/tables")
}

/// A published table as its file holds it.
struct Table {
    name: &'static str,
    rows: Vec<Row>,
}

/// A row with its cells by the head of their column.
struct Row {
    line: u64,
    cells: BTreeMap<String, String>,
}

/// Reads a file and refuses rows which do not say where they come from.
fn table(name: &'static str) -> Table {
    let path = folder().join(format!("{name}.csv"));
    let mut reader = csv::Reader::from_path(&path).expect("a readable file");
    let heads = reader.headers().expect("a line of heads").clone();
    let rows: Vec<Row> = reader
        .records()
        .map(|record| {
            let record = record.expect("a row with as many cells as the head");
            Row {
                line: record.position().map_or(0, csv::Position::line),
                cells: heads
                    .iter()
                    .map(str::to_owned)
                    .zip(record.iter().map(str::to_owned))
                    .collect(),
            }
        })
        .collect();
    assert!(!rows.is_empty(), "{} has no rows", path.display());
    for row in &rows {
        row.check_ground(&path.display().to_string());
    }
    Table { name, rows }
}

impl Row {
    fn check_ground(&self, path: &str) {
        let says = |column: &str| !self.text(column).is_empty();
        let is_well_grounded = match (self.text("ground"), self.readings()) {
            ("published", 1..) => says("source") && says("place"),
            ("derived", 0) => says("place"),
            ("from memory", 0) => true,
            _ => false,
        };
        assert!(
            is_well_grounded,
            "{path} line {}: ground, readings, source and place do not go together",
            self.line
        );
    }

    fn text(&self, column: &str) -> &str {
        self.cells
            .get(column)
            .unwrap_or_else(|| panic!("no column {column}"))
    }

    fn number(&self, column: &str) -> Option<f64> {
        let text = self.text(column);
        (!text.is_empty()).then(|| text.parse().expect("a number"))
    }

    fn needed(&self, column: &str) -> f64 {
        self.number(column)
            .unwrap_or_else(|| panic!("line {}: {column} must not be blank", self.line))
    }

    fn readings(&self) -> u32 {
        self.text("readings").parse().expect("a count")
    }

    fn says_yes(&self, column: &str) -> bool {
        match self.text(column) {
            "yes" => true,
            "no" => false,
            other => panic!("line {}: {column} says {other:?}", self.line),
        }
    }

    /// How well the row is known, as the tag in the code should say.
    fn known(&self) -> Known {
        match (self.text("ground"), self.readings()) {
            ("published", 1) => Known::Read,
            ("published", _) => Known::CrossChecked,
            ("derived", _) => Known::Derived,
            _ => Known::FromMemory,
        }
    }
}

/// Every difference between a file and the code; all rows are compared before the verdict.
struct Findings<'a> {
    file: &'a Table,
    lines: Vec<String>,
}

impl<'a> Findings<'a> {
    fn of(file: &'a Table) -> Self {
        Self {
            file,
            lines: Vec::new(),
        }
    }

    fn say(&mut self, line: String) {
        self.lines.push(line);
    }

    /// The keys of the file are those of the code, in the same order, none missing and none too many.
    fn same_keys(&mut self, column: &str, code: &[f64]) {
        let printed: Vec<f64> = self
            .file
            .rows
            .iter()
            .map(|row| row.needed(column))
            .collect();
        let is_equal =
            printed.len() == code.len() && printed.iter().zip(code).all(|(a, b)| is_same(*a, *b));
        if !is_equal {
            self.say(format!(
                "{column}: the file has {printed:?}, the code {code:?}"
            ));
        }
    }

    fn same_words(&mut self, column: &str, code: &[&str]) {
        let printed: Vec<&str> = self.file.rows.iter().map(|row| row.text(column)).collect();
        if printed != code {
            self.say(format!(
                "{column}: the file has {printed:?}, the code {code:?}"
            ));
        }
    }

    fn cell(&mut self, printed: &Row, column: &str, code: Option<f64>) {
        let wanted = printed.number(column);
        let is_equal = match (wanted, code) {
            (Some(wanted), Some(code)) => is_same(wanted, code),
            (None, None) => true,
            _ => false,
        };
        if !is_equal {
            self.say(format!(
                "line {}, {column}: the file has {wanted:?}, the code {code:?} ({}, {})",
                printed.line,
                printed.text("source"),
                printed.text("place")
            ));
        }
    }

    fn word(&mut self, printed: &Row, column: &str, code: &str) {
        let wanted = printed.text(column);
        if wanted != code {
            self.say(format!(
                "line {}, {column}: the file has {wanted:?}, the code {code:?}",
                printed.line
            ));
        }
    }

    fn same<T: PartialEq + Debug>(&mut self, printed: &Row, what: &str, got: T, wanted: T) {
        if got != wanted {
            self.say(format!(
                "line {}, {what}: got {got:?}, wanted {wanted:?}",
                printed.line
            ));
        }
    }

    fn known(&mut self, printed: &Row, code: Known) {
        self.same(printed, "how it is known", code, printed.known());
    }

    /// A rule which reads one whole table is known as its least known row.
    fn rule_known(&mut self, rule: &Rule) {
        let tags: BTreeSet<Known> = self.file.rows.iter().map(Row::known).collect();
        let least = tags.last().copied();
        if least != Some(rule.known) {
            self.say(format!(
                "{} says {:?}, its least known row is {least:?}",
                rule.id, rule.known
            ));
        }
    }

    /// A rule which reads a table of both well and less known rows: from memory only where a row is.
    fn rule_ground(&mut self, rule: &Rule) {
        let from_memory = Known::FromMemory;
        let has_such_row = self.file.rows.iter().any(|row| row.known() == from_memory);
        if has_such_row != (rule.known == from_memory) {
            self.say(format!(
                "{} says {:?}, a row from memory: {has_such_row}",
                rule.id, rule.known
            ));
        }
    }

    #[track_caller]
    fn verdict(self) {
        assert!(
            self.lines.is_empty(),
            "{}.csv and the code differ:\n{}",
            self.file.name,
            self.lines.join("\n")
        );
    }
}
