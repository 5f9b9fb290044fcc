//! Supply, site, incoming run and enclosure with their gaps filled.

use super::Assumption;
use super::reader::{Reader, device, mapped};
use crate::quantity::{
    AirFlow, ApparentPower, Current, Frequency, Length, Power, Ratio, Temperature, Transmittance,
    Voltage,
};
use crate::sheet::{Choice, Sheet};
use crate::sizing::basis::Basis;
use crate::sizing::conductor::RunInput;
use crate::sizing::reactor::ReactorSupply;
use crate::tables::enclosure::{Mounting, WallMaterial, wall_coefficient};
use crate::tables::{DeviceType, Edition};
use crate::working::{Field, Given, Holder, Run};

/// What every feeder sees of the sheet. A feeder is worked again only when this, the air inside, or the feeder changes.
#[derive(Debug, Clone, PartialEq)]
pub struct Site {
    /// Rule family and edition.
    pub basis: Basis,
    /// Supply as reactors and currents see it; its voltage is `None` until entered.
    pub supply: Option<ReactorSupply>,
    /// Highest temperature around the enclosure.
    pub ambient: Given<Temperature>,
}

impl Site {
    /// Voltage between lines, where entered.
    pub fn voltage(&self) -> Option<&Given<Voltage>> {
        self.supply.as_ref().map(|supply| &supply.voltage)
    }
}

/// The enclosure with its gaps filled.
#[derive(Debug, Clone, PartialEq)]
pub struct EnclosureInputs {
    /// Height, width, depth, where all are entered.
    pub measures: Option<[Given<Length>; 3]>,
    /// How it stands.
    pub mounting: Mounting,
    /// Wall coefficient: entered, or by material.
    pub coefficient: Given<Transmittance>,
    /// Whether it stands outdoors.
    pub is_outdoors: bool,
    /// Heat of the sun, where entered.
    pub sun: Option<Given<Power>>,
    /// Whether fans blow air through.
    pub is_ventilated: bool,
    /// Highest temperature allowed inside.
    pub limit: Given<Temperature>,
    /// Airflow of the installed fans, where entered.
    pub installed_airflow: Option<Given<AirFlow>>,
}

/// The sheet itself with its gaps filled.
#[derive(Debug, Clone, PartialEq)]
pub struct SheetInputs {
    /// What every feeder sees.
    pub site: Site,
    /// Fault current at the start of the incoming run, where entered.
    pub source_fault: Option<Given<Current>>,
    /// Transformer power, where entered.
    pub transformer: Option<Given<ApparentPower>>,
    /// Transformer impedance.
    pub impedance: Given<Ratio>,
    /// Whether it was measured.
    pub is_impedance_measured: bool,
    /// Height of the site.
    pub altitude: Given<Length>,
    /// Incoming run.
    pub incoming: RunInput,
    /// Type of the main device.
    pub main: Given<DeviceType>,
    /// Rating of the main device, where entered.
    pub main_rating: Option<Given<Current>>,
    /// Short-circuit rating of the main device, where entered.
    pub main_short_circuit_rating: Option<Given<Current>>,
    /// Loss of the main device, where entered.
    pub main_loss: Option<Given<Power>>,
    /// Enclosure.
    pub enclosure: EnclosureInputs,
    /// What was assumed.
    pub assumptions: Vec<Assumption>,
}

/// Fills the gaps of the sheet itself.
pub fn site(sheet: &Sheet) -> SheetInputs {
    let mut reader = Reader::of(&sheet.record, Holder::Sheet);
    let basis = basis(&mut reader);
    reader.choice_or(Field::Units, Choice::UsCustomary);
    let ambient = reader.quantity_or(Field::RoomAmbient, Temperature::celsius(40.0));
    let voltage: Option<Given<Voltage>> = reader.quantity(Field::SupplyVoltage);
    let frequency = reader.quantity_or(Field::SupplyFrequency, Frequency::hertz(60.0));
    let transformer: Option<Given<ApparentPower>> = reader.quantity(Field::TransformerPower);
    let impedance = reader.quantity_or(Field::TransformerImpedance, Ratio::per_cent(5.75));
    let is_impedance_measured = reader
        .choice_or(Field::ImpedanceKind, Choice::Nameplate)
        .value
        == Choice::MeasuredImpedance;
    let unbalance = reader.quantity_or(Field::VoltageUnbalance, Ratio::per_cent(1.0));
    let has_capacitors = reader.choice_or(Field::Capacitors, Choice::No).value == Choice::Yes;
    let has_surges = reader.choice_or(Field::Surges, Choice::No).value == Choice::Yes;
    let altitude = reader.quantity_or(Field::Altitude, Length::metres(0.0));
    let source_fault = reader.quantity(Field::SourceFaultCurrent);
    let supply = voltage.map(|voltage| ReactorSupply {
        voltage,
        frequency,
        power: transformer.clone(),
        impedance: impedance.clone(),
        fault: source_fault.clone(),
        unbalance,
        has_capacitors,
        has_surges,
    });
    let incoming = super::feeder::run(&mut reader, Run::Incoming, Choice::Field, &ambient, None);
    let main = mapped(
        reader.choice_or(Field::MainType, Choice::InverseTimeBreaker),
        device,
    );
    let main_rating = reader.quantity(Field::MainRating);
    let main_short_circuit_rating = reader.quantity(Field::MainShortCircuitRating);
    let main_loss = reader.quantity(Field::MainLoss);
    let enclosure = enclosure(&mut reader);
    SheetInputs {
        site: Site {
            basis,
            supply,
            ambient,
        },
        source_fault,
        transformer,
        impedance,
        is_impedance_measured,
        altitude,
        incoming,
        main,
        main_rating,
        main_short_circuit_rating,
        main_loss,
        enclosure,
        assumptions: reader.into_assumptions(),
    }
}

/// The basis by which the sheet is worked. One basis in one edition is offered so far: another is read here.
fn basis(reader: &mut Reader<'_>) -> Basis {
    reader.choice_or(Field::Basis, Choice::Nec);
    reader.choice_or(Field::Edition, Choice::Nec2023);
    Basis::Nec(Edition::Nec2023)
}

fn enclosure(reader: &mut Reader<'_>) -> EnclosureInputs {
    let measures = [
        Field::EnclosureHeight,
        Field::EnclosureWidth,
        Field::EnclosureDepth,
    ]
    .map(|field| reader.quantity(field));
    let measures = match measures {
        [Some(height), Some(width), Some(depth)] => Some([height, width, depth]),
        _ => None,
    };
    let coefficient = match reader.quantity(Field::WallCoefficient) {
        Some(entered) => entered,
        None => {
            let material = reader.choice_or(Field::EnclosureMaterial, Choice::Painted);
            mapped(material, |choice| wall_coefficient(material_of(choice)))
        }
    };
    let mounting = mounting(reader.choice_or(Field::Mounting, Choice::Free).value);
    let is_outdoors =
        reader.choice_or(Field::Surroundings, Choice::Indoors).value == Choice::Outdoors;
    let is_ventilated =
        reader.choice_or(Field::Cooling, Choice::Sealed).value == Choice::FilterFans;
    let limit = reader.quantity_or(Field::InsideLimit, Temperature::celsius(50.0));
    EnclosureInputs {
        measures,
        mounting,
        coefficient,
        is_outdoors,
        sun: reader.quantity(Field::SunHeat),
        is_ventilated,
        limit,
        installed_airflow: reader.quantity(Field::InstalledAirflow),
    }
}

fn material_of(choice: Choice) -> WallMaterial {
    match choice {
        Choice::BareMetal => WallMaterial::BareMetal,
        Choice::Plastic => WallMaterial::Plastic,
        Choice::DoubleWalled => WallMaterial::DoubleWalled,
        _ => WallMaterial::Painted,
    }
}

fn mounting(choice: Choice) -> Mounting {
    match choice {
        Choice::AgainstWall => Mounting::AgainstWall,
        Choice::RowEnd => Mounting::RowEnd,
        Choice::WallRowEnd => Mounting::WallRowEnd,
        Choice::RowMiddle => Mounting::RowMiddle,
        Choice::WallRowMiddle => Mounting::WallRowMiddle,
        Choice::WallRowMiddleCovered => Mounting::WallRowMiddleCovered,
        _ => Mounting::Free,
    }
}
