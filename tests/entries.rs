//! What typed text means: each row is a text, the field it is typed into, and the entry or the refusal.

#![allow(
    clippy::expect_used,
    clippy::unwrap_used,
    reason = "helpers of tests stop at the first surprise"
)]

use proptest::prelude::*;
use proptest::sample::select;
use std::collections::BTreeSet;
use ventrail::entry::{Refusal, choice_spellings, read, unit_spellings, units_for};
use ventrail::quantity::Unit::{self, *};
use ventrail::quantity::WireSize::{self, *};
use ventrail::sheet::Choice::{self, *};
use ventrail::sheet::UnitSystem::{self, Si, Us};
use ventrail::sheet::{Entry, Home, LONGEST_TEXT, Measured, Record, Shape, fields_of, spec};
use ventrail::words;
use ventrail::working::Field::{self, *};
use ventrail::working::{Run as R, RunField};

const LENGTH: Field = Run(R::Behind, RunField::Length);
const SETS: Field = Run(R::Behind, RunField::Sets);
const SIZE: Field = Run(R::Behind, RunField::Size);
const PLACE: Field = Run(R::Behind, RunField::Place);
const POWER_FACTOR: Field = Run(R::Behind, RunField::PowerFactor);

#[test]
fn a_number_is_read_with_its_unit_or_in_the_unit_of_the_field() {
    let rows = [
        // Marks, gaps and signs.
        (SupplyVoltage, Us, "480", 480.0, Volt),
        (SupplyVoltage, Us, "  480 V ", 480.0, Volt),
        (SupplyVoltage, Us, "480V", 480.0, Volt),
        (SupplyVoltage, Us, "+480", 480.0, Volt),
        (SupplyVoltage, Us, "480.", 480.0, Volt),
        (SupplyVoltage, Us, "4.8e2", 480.0, Volt),
        (SupplyVoltage, Us, "4,8E+2 volts", 480.0, Volt),
        (SupplyVoltage, Us, "0.48 kV", 0.48, Kilovolt),
        (SupplyVoltage, Us, ".48 KV", 0.48, Kilovolt),
        (SupplyVoltage, Us, "480 VAC", 480.0, Volt),
        (MotorCurrent, Us, "13.3", 13.3, Ampere),
        (MotorCurrent, Us, "13,3", 13.3, Ampere),
        (MotorCurrent, Us, "13,30", 13.3, Ampere),
        (MotorCurrent, Us, "13,3000", 13.3, Ampere),
        (MotorCurrent, Us, "3.900", 3.9, Ampere),
        (MotorCurrent, Us, "0,900", 0.9, Ampere),
        (MotorCurrent, Us, ",900 A", 0.9, Ampere),
        (MotorCurrent, Us, "1234,567 A", 1234.567, Ampere),
        (MotorCurrent, Us, "1 234,567 A", 1234.567, Ampere),
        (MotorCurrent, Us, "1'234.5 amps", 1234.5, Ampere),
        (Altitude, Si, "1\u{a0}900 m", 1900.0, Metre),
        (Altitude, Si, "1\u{2009}900", 1900.0, Metre),
        (Altitude, Si, "1\u{202f}900", 1900.0, Metre),
        (Altitude, Si, "1’900", 1900.0, Metre),
        (Altitude, Si, "\u{2212}12", -12.0, Metre),
        (Altitude, Us, "- 12 ft", -12.0, Foot),
        (SunHeat, Si, "-0", 0.0, Watt),
        // Units.
        (Altitude, Us, "6200", 6200.0, Foot),
        (Altitude, Us, "6200'", 6200.0, Foot),
        (Altitude, Us, "1900m", 1900.0, Metre),
        (RoomAmbient, Us, "104", 104.0, Fahrenheit),
        (RoomAmbient, Si, "40", 40.0, Celsius),
        (RoomAmbient, Us, "40 C", 40.0, Celsius),
        (RoomAmbient, Us, "40 °C", 40.0, Celsius),
        (RoomAmbient, Us, "40 deg C", 40.0, Celsius),
        (RoomAmbient, Us, "40degC", 40.0, Celsius),
        (RoomAmbient, Si, "104 F", 104.0, Fahrenheit),
        (RoomAmbient, Si, "104°f", 104.0, Fahrenheit),
        (RoomAmbient, Si, "313 K", 313.0, Kelvin),
        (MotorPower, Us, "15", 15.0, Horsepower),
        (MotorPower, Si, "15 HP", 15.0, Horsepower),
        (MotorPower, Si, "11", 11.0, Kilowatt),
        (MotorPower, Us, "11 kw", 11.0, Kilowatt),
        (MotorPower, Us, "7,5 kW", 7.5, Kilowatt),
        (MotorPower, Us, "1/2 hp", 0.5, Horsepower),
        (MotorPower, Us, "3/4", 0.75, Horsepower),
        (MotorPower, Us, "7 1/2 hp", 7.5, Horsepower),
        (MotorPower, Us, "7-1/2hp", 7.5, Horsepower),
        (MotorPower, Us, "1\u{a0}1/2 HP", 1.5, Horsepower),
        (EnclosureHeight, Us, "72", 72.0, Inch),
        (EnclosureHeight, Us, "71 1/4\"", 71.25, Inch),
        (EnclosureHeight, Us, "72 in.", 72.0, Inch),
        (EnclosureHeight, Us, "6 ft", 6.0, Foot),
        (EnclosureHeight, Us, "6″", 6.0, Inch),
        (EnclosureHeight, Us, "2 000 mm", 2000.0, Millimetre),
        (EnclosureHeight, Si, "200 cm", 200.0, Centimetre),
        (TransformerPower, Us, "1500", 1500.0, KilovoltAmpere),
        (TransformerPower, Us, "1.5 MVA", 1.5, MegavoltAmpere),
        (TransformerPower, Us, "1.5 mva", 1.5, MegavoltAmpere),
        (TransformerPower, Us, "750 kva", 750.0, KilovoltAmpere),
        (TransformerImpedance, Us, "5.75", 5.75, PerCent),
        (TransformerImpedance, Us, "5.75 %", 5.75, PerCent),
        (TransformerImpedance, Us, "5,75%", 5.75, PerCent),
        (POWER_FACTOR, Us, "85 per cent", 85.0, PerCent),
        (ShortCircuitRating, Us, "65", 65.0, Kiloampere),
        (ShortCircuitRating, Us, "5000 A", 5000.0, Ampere),
        (InstalledAirflow, Us, "500 cfm", 500.0, CubicFootPerMinute),
        (InstalledAirflow, Si, "500 CFM", 500.0, CubicFootPerMinute),
        (InstalledAirflow, Us, "850 m³/h", 850.0, CubicMetrePerHour),
        (InstalledAirflow, Us, "850 m3/h", 850.0, CubicMetrePerHour),
        (
            InstalledAirflow,
            Us,
            "0.25 m^3/s",
            0.25,
            CubicMetrePerSecond,
        ),
        (
            WallCoefficient,
            Us,
            "5.5 W/m2K",
            5.5,
            WattPerSquareMetreKelvin,
        ),
        (
            WallCoefficient,
            Us,
            "5.5 W/(m²·K)",
            5.5,
            WattPerSquareMetreKelvin,
        ),
        (
            WallCoefficient,
            Us,
            "5.5 W/m²K",
            5.5,
            WattPerSquareMetreKelvin,
        ),
        (DriveLoss, Us, "0.4 kW", 0.4, Kilowatt),
        (SupplyFrequency, Us, "60 hz", 60.0, Hertz),
    ];
    for (field, system, text, number, unit) in rows {
        let text_kept = text.trim().to_owned();
        let measured = Measured {
            number,
            unit,
            text: text_kept,
        };
        assert_eq!(
            read(field, system, text),
            Ok(Some(Entry::Measured(measured))),
            "for {text:?}"
        );
    }
}

#[test]
fn nought_has_no_sign() {
    for text in ["-0", "\u{2212}0.0 W", "-1e-999"] {
        let Ok(Some(Entry::Measured(measured))) = read(SunHeat, Us, text) else {
            panic!("{text} is not taken");
        };
        assert_eq!(measured.number.to_bits(), 0.0_f64.to_bits(), "for {text:?}");
    }
}

#[test]
fn a_mark_which_may_part_thousands_is_refused_with_both_readings() {
    let rows = [
        (Altitude, "3,900", [3900.0, 3.9], Foot),
        (Altitude, "3,900 m", [3900.0, 3.9], Metre),
        (Altitude, "-3,900", [-3900.0, -3.9], Foot),
        (
            TransformerPower,
            "112,500",
            [112_500.0, 112.5],
            KilovoltAmpere,
        ),
        (MotorCurrent, "1,234.5", [1234.5, 1.2345], Ampere),
        (MotorCurrent, "1.234,5 A", [1234.5, 1.2345], Ampere),
        (MotorCurrent, "1,234,567", [1_234_567.0, 1.234_567], Ampere),
        (MotorCurrent, "1.234.567", [1_234_567.0, 1.234_567], Ampere),
        (
            MotorCurrent,
            "1,234,567.8",
            [1_234_567.8, 1.234_567_8],
            Ampere,
        ),
        (TransformerImpedance, "5,750 %", [5750.0, 5.75], PerCent),
    ];
    for (field, text, readings, unit) in rows {
        let refusal = Refusal::TwoReadings {
            text: text.to_owned(),
            readings,
            unit,
        };
        assert_eq!(read(field, Us, text), Err(refusal));
    }
}

#[test]
fn what_is_no_number_is_refused() {
    let texts = [
        "pump",
        "V",
        "-",
        ".",
        ",",
        "e3",
        "--5",
        "NaN",
        "inf",
        "\u{221e}",
        "1..2",
        "1,,2",
        "12.12.2025",
        "1.2,3.4",
        "1,23.4",
        "1 2",
        "12 34",
        "1 23 456",
        "1234 567",
        "1 234.567 8",
        "480, 60",
        "480  60",
        "5'6\"",
        "1,234,",
        "\u{feff}480",
        "①",
        "٤٨٠",
    ];
    for text in texts {
        let refusal = Refusal::NotANumber {
            text: text.to_owned(),
        };
        assert_eq!(read(SupplyVoltage, Us, text), Err(refusal));
    }
}

#[test]
fn a_unit_is_refused_with_those_that_fit() {
    let voltages = vec![Volt, Kilovolt];
    let powers = vec![Watt, Kilowatt, Horsepower];
    let rows = [
        (
            SupplyVoltage,
            "480 furlongs",
            Err("furlongs"),
            voltages.clone(),
        ),
        (
            SupplyVoltage,
            "480 V 60 Hz",
            Err("V 60 Hz"),
            voltages.clone(),
        ),
        (SupplyVoltage, "480 e", Err("e"), voltages.clone()),
        (SupplyVoltage, "480e", Err("e"), voltages.clone()),
        (SupplyVoltage, "480e-", Err("e-"), voltages.clone()),
        (SupplyVoltage, "480/277", Err("/277"), voltages.clone()),
        (SupplyVoltage, "480 A", Ok("A"), voltages.clone()),
        (SupplyVoltage, "48 %", Ok("%"), voltages),
        (MotorPower, "15 PS", Err("PS"), powers.clone()),
        (MotorPower, "15 kVA", Ok("kVA"), powers.clone()),
        (MotorPower, "1/0 hp", Err("/0 hp"), powers.clone()),
        (MotorPower, "3/2 hp", Err("/2 hp"), powers.clone()),
        (MotorPower, "1/1 hp", Err("/1 hp"), powers.clone()),
        (MotorPower, "1/100000", Err("/100000"), powers.clone()),
        (DriveLoss, "400 F", Ok("F"), powers.clone()),
        (DriveLoss, "1/2 kW", Err("/2 kW"), powers),
        (
            RoomAmbient,
            "40°",
            Err("°"),
            vec![Celsius, Fahrenheit, Kelvin],
        ),
        (TransformerImpedance, "0.0575 x", Ok("x"), vec![PerCent]),
        (
            TransformerPower,
            "1500 mVA",
            Err("mVA"),
            vec![VoltAmpere, KilovoltAmpere, MegavoltAmpere],
        ),
        (
            LENGTH,
            "5' 6\"",
            Err("' 6\""),
            vec![Metre, Millimetre, Centimetre, Foot, Inch],
        ),
    ];
    for (field, text, unit, fits) in rows {
        // `Ok` is a unit of something else, `Err` no unit at all.
        let refusal = match unit {
            Ok(unit) => Refusal::WrongUnit {
                unit: unit.to_owned(),
                fits,
            },
            Err(unit) => Refusal::UnknownUnit {
                unit: unit.to_owned(),
                fits,
            },
        };
        assert_eq!(read(field, Us, text), Err(refusal));
    }
}

#[test]
fn a_value_outside_its_range_is_refused_with_the_range() {
    let rows = [
        (SupplyVoltage, "48", Volt),
        (SupplyVoltage, "4.8 kV", Kilovolt),
        (SupplyVoltage, "-480", Volt),
        (SupplyVoltage, "1e999", Volt),
        (RoomAmbient, "40 K", Kelvin),
        (RoomAmbient, "160", Fahrenheit),
        (POWER_FACTOR, "0.85", PerCent),
        (MotorPower, "0", Horsepower),
    ];
    for (field, text, unit) in rows {
        let Shape::Measured { least, most, .. } = spec(field).shape else {
            panic!("{field:?} is not measured");
        };
        let refusal = Refusal::OutOfRange {
            text: text.to_owned(),
            least,
            most,
            unit,
        };
        assert_eq!(read(field, Us, text), Err(refusal));
    }
}

#[test]
fn a_count_is_a_whole_number_within_its_range() {
    for (text, count) in [("1", 1), (" 2 ", 2), ("+3", 3), ("012", 12)] {
        assert_eq!(
            read(SETS, Us, text),
            Ok(Some(Entry::Count(count))),
            "for {text:?}"
        );
    }
    let (least, most) = (1, 12);
    for text in [
        "two", "2.0", "2,5", "2 sets", "-1", "1e1", "1/2", "1 2", "1,000",
    ] {
        let refusal = Refusal::NotWhole {
            text: text.to_owned(),
            least,
            most,
        };
        assert_eq!(read(SETS, Us, text), Err(refusal));
    }
    for text in ["0", "13", "1 000", "99999999999999999999"] {
        let refusal = Refusal::CountOutOfRange {
            text: text.to_owned(),
            least,
            most,
        };
        assert_eq!(read(SETS, Us, text), Err(refusal));
    }
}

#[test]
fn a_size_is_read_as_the_trade_writes_it() {
    let rows = [
        ("2", Awg2),
        ("#2", Awg2),
        ("# 2", Awg2),
        ("2 AWG", Awg2),
        ("2awg", Awg2),
        ("AWG 2", Awg2),
        ("AWG #2", Awg2),
        ("#2 awg", Awg2),
        ("14 ga", Awg14),
        ("18", Awg18),
        ("0", Awg1Over0),
        ("1/0", Awg1Over0),
        ("1/0 AWG", Awg1Over0),
        ("#1/0", Awg1Over0),
        ("00", Awg2Over0),
        ("000", Awg3Over0),
        ("0000", Awg4Over0),
        ("4/0", Awg4Over0),
        ("250", Kcmil250),
        ("250 kcmil", Kcmil250),
        ("250 MCM", Kcmil250),
        ("1000kcmil", Kcmil1000),
        ("2000", Kcmil2000),
    ];
    for (text, size) in rows {
        assert_eq!(
            read(SIZE, Us, text),
            Ok(Some(Entry::Size(size))),
            "for {text:?}"
        );
    }
}

#[test]
fn a_size_which_is_not_made_is_refused_with_its_neighbours() {
    let rows = [
        ("5", Some(Awg6), Some(Awg4)),
        ("5 AWG", Some(Awg6), Some(Awg4)),
        ("13", Some(Awg14), Some(Awg12)),
        ("20", None, Some(Awg18)),
        ("5/0", Some(Kcmil250), Some(Kcmil300)),
        ("240", Some(Awg4Over0), Some(Kcmil250)),
        ("450 kcmil", Some(Kcmil400), Some(Kcmil500)),
        ("2500", Some(Kcmil2000), None),
        ("2 kcmil", Some(Awg18), Some(Awg16)),
        ("250 AWG", None, Some(Awg18)),
        ("#250", None, Some(Awg18)),
        ("1/2 mm2", None, None),
        ("", None, None),
        ("two", None, None),
        ("2 m", None, None),
        ("1/0 kcmil", None, None),
        ("2 AWG copper", None, None),
        ("1,250 kcmil", None, None),
        ("99999999", None, None),
    ];
    for (text, smaller, larger) in rows {
        let refusal = Refusal::UnknownSize {
            text: text.to_owned(),
            smaller,
            larger,
        };
        let expected = if text.is_empty() {
            Ok(None)
        } else {
            Err(refusal)
        };
        assert_eq!(read(SIZE, Us, text), expected);
    }
}

#[test]
fn a_metric_size_is_refused_with_the_next_larger_one() {
    let rows = [
        ("35 mm2", Some(Awg1)),
        ("35 mm²", Some(Awg1)),
        ("35mm^2", Some(Awg1)),
        ("2,5 mm2", Some(Awg12)),
        ("2.5 sq mm", Some(Awg12)),
        ("0.5 mm2", Some(Awg18)),
        ("120 mm2", Some(Kcmil250)),
        ("1 mm2", Some(Awg16)),
        ("5000 mm2", None),
    ];
    for (text, larger) in rows {
        let refusal = Refusal::MetricSize {
            text: text.to_owned(),
            larger,
        };
        assert_eq!(read(SIZE, Us, text), Err(refusal));
    }
}

#[test]
fn an_answer_is_read_by_its_spelling_its_beginning_or_a_word_of_it() {
    let rows = [
        (Cooling, "sealed", Sealed),
        (Cooling, "FANS", FilterFans),
        (Cooling, "s", Sealed),
        (PLACE, "Inside", Inside),
        (PLACE, "f", Choice::Field),
        (DeviceType, "breaker", InverseTimeBreaker),
        (DeviceType, "cb", InverseTimeBreaker),
        (DeviceType, "Class CC", ClassCcFuse),
        (DeviceType, "cc", ClassCcFuse),
        (DeviceType, "time-delay", TimeDelayFuse),
        (DeviceType, "dual element", TimeDelayFuse),
        (DeviceType, "non-time-delay fuse", NontimeDelayFuse),
        (Mounting, "row end", RowEnd),
        (Mounting, "Row end, against a wall", WallRowEnd),
        (Run(R::Behind, RunField::Metal), "Cu", Copper),
        (Run(R::Behind, RunField::Metal), "aluminum", Aluminium),
        (Run(R::Behind, RunField::Conduit), "PVC", PvcConduit),
        (Run(R::Behind, RunField::Insulation), "75 °C", Insulation75),
        (Run(R::Behind, RunField::Insulation), "90", Insulation90),
        (Run(R::Behind, RunField::Terminal), "60C", Marked60),
        (Capacitors, "Y", Yes),
        (Capacitors, "none", No),
        (Units, "metric", Choice::Si),
        (Edition, "2023", Nec2023),
    ];
    for (field, text, choice) in rows {
        assert_eq!(
            read(field, Us, text),
            Ok(Some(Entry::Choice(choice))),
            "for {text:?}"
        );
    }
}

#[test]
fn an_answer_in_doubt_is_refused_with_those_that_fit() {
    let rows = [
        (MainType, "fuse", vec![TimeDelayFuse, NontimeDelayFuse]),
        (DeviceType, "delay", vec![TimeDelayFuse, NontimeDelayFuse]),
        (
            Run(R::Behind, RunField::Conduit),
            "conduit",
            vec![SteelConduit, PvcConduit, AluminiumConduit],
        ),
        (Surroundings, "oors", vec![]),
        (Surroundings, "cellar", vec![]),
        (Surroundings, "!", vec![]),
        (Edition, "2020", vec![]),
    ];
    for (field, text, fitting) in rows {
        let text_kept = text.to_owned();
        let refusal = if fitting.is_empty() {
            Refusal::NotOffered {
                text: text_kept,
                offered: offered(field),
            }
        } else {
            Refusal::SeveralFit {
                text: text_kept,
                fitting,
            }
        };
        assert_eq!(read(field, Us, text), Err(refusal));
    }
}

#[test]
fn several_answers_are_parted_by_commas_signs_or_words() {
    let rows: [(&str, &[Choice]); 7] = [
        ("breaker", &[InverseTimeBreaker]),
        ("class cc, breaker", &[ClassCcFuse, InverseTimeBreaker]),
        (
            "Class CC fuse; Inverse time breaker",
            &[ClassCcFuse, InverseTimeBreaker],
        ),
        ("breaker + cc", &[ClassCcFuse, InverseTimeBreaker]),
        (
            "breaker and cc AND time-delay fuse",
            &[TimeDelayFuse, ClassCcFuse, InverseTimeBreaker],
        ),
        ("cc, cc,", &[ClassCcFuse]),
        ("nontime, time", &[TimeDelayFuse, NontimeDelayFuse]),
    ];
    for (text, choices) in rows {
        let entry = Entry::Choices(choices.iter().copied().collect());
        assert_eq!(
            read(PermittedTypes, Us, text),
            Ok(Some(entry)),
            "for {text:?}"
        );
    }
    let not_offered = |text: &str| Refusal::NotOffered {
        text: text.to_owned(),
        offered: offered(PermittedTypes),
    };
    assert_eq!(
        read(PermittedTypes, Us, "cc and cheese"),
        Err(not_offered("cheese"))
    );
    assert_eq!(
        read(PermittedTypes, Us, ", and ;"),
        Err(not_offered(", and ;"))
    );
}

#[test]
fn text_is_kept_as_typed_without_the_blanks_around_it() {
    let entry = Entry::Text("Pump  „Nord“ #3".to_owned());
    assert_eq!(read(Load, Us, " Pump  „Nord“ #3 "), Ok(Some(entry)));
    for empty in ["", " ", "\u{a0}\t\r\n"] {
        assert_eq!(read(Load, Us, empty), Ok(None));
        assert_eq!(read(SupplyVoltage, Us, empty), Ok(None));
    }
    for text in ["a\tb", "a\nb", "a\u{0}b", "a\u{85}b"] {
        let refusal = Refusal::ControlCharacter {
            text: text.to_owned(),
        };
        assert_eq!(read(Load, Us, text), Err(refusal.clone()));
        assert_eq!(read(SupplyVoltage, Us, text), Err(refusal));
    }
    let too_long = |length, most| Err(Refusal::TooLong { length, most });
    assert!(read(Tag, Us, &"é".repeat(24)).is_ok());
    assert_eq!(read(Tag, Us, &"é".repeat(25)), too_long(25, 24));
    assert_eq!(
        read(SupplyVoltage, Us, &"1".repeat(5000)),
        too_long(5000, LONGEST_TEXT)
    );
}

/// A spelling which is also the beginning of another's would otherwise be refused, or worse, be taken for it.
#[test]
fn every_spelling_of_an_answer_is_read_as_that_answer() {
    for field in all_fields() {
        for choice in offered(field) {
            for spelling in choice_spellings(*choice) {
                assert_answer(field, spelling, *choice);
            }
        }
    }
}

#[test]
fn every_answer_is_read_again_as_the_page_words_it() {
    for field in all_fields() {
        for choice in offered(field) {
            assert_answer(field, words::choice(*choice), *choice);
        }
    }
}

#[track_caller]
fn assert_answer(field: Field, text: &str, choice: Choice) {
    let entry = match spec(field).shape {
        Shape::Choices(_) => Entry::Choices(BTreeSet::from([choice])),
        _ => Entry::Choice(choice),
    };
    assert_eq!(
        read(field, Us, text),
        Ok(Some(entry)),
        "for {text:?} in {field:?}"
    );
}

#[test]
fn every_spelling_of_a_unit_is_read_as_that_unit() {
    for field in all_fields() {
        for unit in fitting_units(field) {
            for spelling in unit_spellings(unit)
                .iter()
                .chain([&words::unit_symbol(unit)])
            {
                let entry = read(field, Us, &within(field, unit, spelling));
                let Ok(Some(Entry::Measured(measured))) = entry else {
                    panic!("{spelling} is not taken in {field:?}: {entry:?}");
                };
                assert_eq!(measured.unit, unit, "for {spelling} in {field:?}");
            }
        }
    }
}

#[test]
fn every_size_is_read_again_as_the_page_words_it() {
    for size in WireSize::ALL {
        for text in [size.number(), &words::size(size)] {
            assert_eq!(read(SIZE, Us, text), Ok(Some(Entry::Size(size))));
        }
    }
}

proptest! {
    /// And whatever is taken, the record takes too.
    #[test]
    fn any_text_gives_an_answer(
        field in select(all_fields()),
        system in select(vec![Us, Si]),
        text in prop_oneof![any::<String>(), likely_text()],
    ) {
        if let Ok(Some(entry)) = read(field, system, &text) {
            if let Entry::Measured(measured) = &entry {
                prop_assert_eq!(measured.text.as_str(), text.trim());
            }
            prop_assert!(Record::default().set(field, entry).is_ok());
        }
    }

    #[test]
    fn a_printed_number_is_read_again_to_the_last_bit(
        (field, unit) in select(measured_fields()),
        share in 0.0..=1.0,
        format in 0..4,
    ) {
        let number = between(field, unit, share);
        let printed = match format {
            0 => format!("{number}"),
            1 => format!("{number:e}"),
            2 => format!("{number:.12}0").replace('.', ","),
            _ => with_gaps(&format!("{number}"), '\u{202f}'),
        };
        let spelling = unit_spellings(unit)[0];
        let entry = read(field, Us, &format!("{printed} {spelling}"));
        let Ok(Some(Entry::Measured(measured))) = entry else {
            return Err(TestCaseError::fail(format!("{printed} {spelling} gives {entry:?}")));
        };
        let expected = if format == 2 { format!("{number:.12}").parse().unwrap() } else { number };
        prop_assert_eq!(measured.number.to_bits(), f64::to_bits(expected + 0.0));
    }

    /// Case and blanks say nothing, but for the one prefix which has two.
    #[test]
    fn the_case_of_a_unit_does_not_matter((field, unit) in select(measured_fields()), blanks in 0_usize..3) {
        prop_assume!(unit != MegavoltAmpere);
        for spelling in unit_spellings(unit) {
            let gap = " ".repeat(blanks);
            let text = within(field, unit, &format!("{gap}{}", spelling.to_uppercase()));
            let entry = read(field, Si, &text);
            let has_unit = matches!(&entry, Ok(Some(Entry::Measured(measured))) if measured.unit == unit);
            prop_assert!(has_unit, "{} gives {:?}", text, entry);
        }
    }
}

/// Texts made of what numbers, units and sizes are made of, so that many come close to being one.
fn likely_text() -> impl Strategy<Value = String> {
    let piece = select(vec![
        "1", "2", "12", "234", "0", "00", "900", ".", ",", " ", "\u{a0}", "\u{202f}", "'", "’",
        "-", "\u{2212}", "+", "e", "E3", "/", "1/2", "V", "kV", "hp", "kW", "mVA", "%", "°", "°C",
        "F", "m", "m²", "³/h", "\"", "#", "AWG", "kcmil", "mm2", "cc", "fuse", "and", ";", "in",
        "yes", "😀",
    ]);
    proptest::collection::vec(piece, 0..7).prop_map(|pieces| pieces.concat())
}

fn all_fields() -> Vec<Field> {
    [Home::Sheet, Home::Feeder, Home::Source]
        .into_iter()
        .flat_map(fields_of)
        .collect()
}

fn offered(field: Field) -> &'static [Choice] {
    match spec(field).shape {
        Shape::Choice(offered) | Shape::Choices(offered) => offered,
        _ => &[],
    }
}

fn fitting_units(field: Field) -> Vec<Unit> {
    match spec(field).shape {
        Shape::Measured { kind, .. } => units_for(kind),
        _ => Vec::new(),
    }
}

fn measured_fields() -> Vec<(Field, Unit)> {
    all_fields()
        .into_iter()
        .flat_map(|field| {
            fitting_units(field)
                .into_iter()
                .map(move |unit| (field, unit))
        })
        .collect()
}

/// A number of `unit` which lies within the range of `field`, nearer to `most` by `share`.
fn between(field: Field, unit: Unit, share: f64) -> f64 {
    let Shape::Measured { least, most, .. } = spec(field).shape else {
        panic!("{field:?} is not measured");
    };
    unit.from_si(least + (most - least) * share)
}

/// A number within the range of `field`, with `after` behind it; the point keeps three decimals from being in doubt.
fn within(field: Field, unit: Unit, after: &str) -> String {
    format!("{:.6}{after}", between(field, unit, 0.5))
}

/// `printed` with its thousands parted by `gap`.
fn with_gaps(printed: &str, gap: char) -> String {
    let (whole, rest) = printed
        .split_once('.')
        .map_or((printed, String::new()), |(whole, decimals)| {
            (whole, format!(".{decimals}"))
        });
    let sign = if whole.starts_with('-') { "-" } else { "" };
    let digits = whole.trim_start_matches('-');
    let mut parted = String::new();
    for (position, digit) in digits.chars().enumerate() {
        if position > 0 && (digits.len() - position).is_multiple_of(3) {
            parted.push(gap);
        }
        parted.push(digit);
    }
    format!("{sign}{parted}{rest}")
}

#[test]
fn the_unit_of_the_sheet_is_taken_where_none_is_typed() {
    let unit = |system: UnitSystem| match read(LENGTH, system, "12") {
        Ok(Some(Entry::Measured(measured))) => Some(measured.unit),
        _ => None,
    };
    assert_eq!((unit(Us), unit(Si)), (Some(Foot), Some(Metre)));
}
