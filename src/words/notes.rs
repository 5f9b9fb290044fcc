//! Margin notes in words: what was found, why it matters, what to do about it.

use super::entries::accepted;
use super::labels::{label, lower_first, run, run_where, upper_first};
use super::page::listed;
use super::units::{quantities_apart, quantity, size, with_unit};
use crate::quantity::{Temperature, Unit, WireSize};
use crate::sheet::UnitSystem;
use crate::working::{
    Field, Holder, HolderId, MarginNote, MemoryTable, NoteKind, Place, ReactorReason,
};

/// A margin note in words, a sentence or two each.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct NoteWords {
    /// What was found.
    pub what: String,
    /// Why it matters, with its numbers and its clause.
    pub why: String,
    /// What to do about it.
    pub remedy: String,
}

/// The words of a margin note in the units of the sheet.
pub fn note(note: &MarginNote, system: UnitSystem) -> NoteWords {
    match &note.kind {
        NoteKind::DraftRefused { text } => said(
            format!("“{}” was not taken.", shortened(text)),
            format!(
                "{} takes {}. What was typed is kept beside the field; the sheet is worked without it.",
                label(note.place.field),
                accepted(note.place.field, system)
            ),
            "Type it anew within the range, or empty the field.",
        ),
        NoteKind::TagRepeated { tag } => said(
            format!("The tag {} stands at more than one feeder.", shortened(tag)),
            "Tags name the feeders in lists, in notes and on paper; two of one name cannot be told apart.",
            "Give each feeder a tag of its own.",
        ),
        NoteKind::NoLoad => said(
            "This feeder drives nothing yet.",
            "Without a motor power or a motor current nothing is sized for it, and it adds nothing to the totals.",
            "Enter the power of its motor.",
        ),
        NoteKind::SupplyVoltageUnserved { voltage } => said(
            format!(
                "The table of motor currents does not serve {}.",
                quantity(*voltage, system)
            ),
            "NEC 2023, Table 430.250 gives full-load currents for supplies of 200, 208, 220 to 240, 440 to 480 and 550 to 600 V.",
            "Correct the supply voltage, or enter each motor's full-load current.",
        ),
        NoteKind::MotorNotInTable { power } => said(
            format!(
                "The table has no motor of {} at this voltage.",
                quantity(*power, system)
            ),
            "NEC 2023, Table 430.250 does not reach so far, so the full-load current is not known and nothing behind it is sized.",
            "Enter the motor's full-load current from its nameplate.",
        ),
        NoteKind::MotorBetweenRows { power, row } => {
            let (power, row) = quantities_apart(*power, *row, system);
            said(
                format!(
                    "A motor of {power} lies between two rows of the table; the row of {row} is taken."
                ),
                "NEC 2023, Table 430.250 has no row for it. The next row up never gives too small a current.",
                "Enter the motor's full-load current if it is known.",
            )
        }
        NoteKind::DriveInputAssumed { assumed } => said(
            format!(
                "The drive's input current of {} is assumed.",
                quantity(*assumed, system)
            ),
            "It follows from the next motor of the table with usual efficiencies and power factors. Conductors, disconnect, reactor and totals rest on it (NEC 2023, 430.122(A)).",
            "Enter the rated input current from the drive's data sheet.",
        ),
        NoteKind::DriveInputUnknown => said(
            "The drive's input current is not known.",
            "It could not be assumed either, since the motor's power or the supply voltage is missing or lies outside the table. What is ahead of the drive is not sized.",
            "Enter the rated input current from the drive's data sheet.",
        ),
        NoteKind::DriveSmallerThanMotor { input, motor } => {
            let (input, motor) = quantities_apart(*input, *motor, system);
            said(
                format!("The drive takes {input}, its motor {motor}."),
                "A drive which carries its motor's full load usually takes at least the motor's current.",
                "Check that this drive suits this motor and this voltage, and answer why.",
            )
        }
        NoteKind::NoConductorFits {
            run: which,
            needed,
            carries,
            largest,
        } => {
            let (needed, carries) = quantities_apart(*needed, *carries, system);
            said(
                format!("No size carries the {needed} asked of the {}.", run(*which)),
                format!(
                    "Even {}, the largest of the table, carries {carries} with the sets entered.",
                    size(*largest)
                ),
                "Enter more conductors in parallel, 1/0 AWG or larger, or a cooler route.",
            )
        }
        NoteKind::AmbientBeyondInsulation {
            run: which,
            ambient,
        } => said(
            format!(
                "Air of {} is too hot for the insulation of the {}.",
                quantity(*ambient, system),
                run(*which)
            ),
            "NEC 2023, Table 310.15(B)(1)(1) has no factor for this insulation in air so hot: it must not be used there.",
            "Enter insulation for a higher temperature, or a cooler route.",
        ),
        NoteKind::AluminiumInside { run: which } => said(
            format!(
                "The {} are aluminium and lie inside the enclosure.",
                run(*which)
            ),
            "UL 508A, Table 28.1 gives ampacities inside for copper alone.",
            "Choose copper, or let the run lie in the field.",
        ),
        NoteKind::NoCellInColumn { run: which, column } => said(
            format!(
                "No ampacity is printed for conductors in parallel {} in the {} °C column.",
                run_where(*which),
                column.to_celsius().round()
            ),
            "UL 508A, Table 28.1 ends that column at 1 AWG, and conductors in parallel start at 1/0 AWG (NEC 2023, 310.10(G)).",
            "Enter one set, or the mark of the terminals where it is 75 °C.",
        ),
        NoteKind::LengthMissing { run: which } => said(
            format!(
                "The voltage drop is open: the length {} is missing.",
                run_where(*which)
            ),
            "A drop of one run alone would read as the drop of both.",
            "Enter the length one way.",
        ),
        NoteKind::SourceUnknown => said(
            "Whether the source asks for input reactors is open.",
            "Two of the reasons of practice go by the power and the impedance of the source, and no transformer is entered.",
            "Enter the transformer; a fault current alone answers for the impedance, not for the power.",
        ),
        NoteKind::ConductorTooSmall {
            run: which,
            entered,
            smallest,
        } => said(
            format!("{} is too small for the {}.", size(*entered), run(*which)),
            format!(
                "The rules ask for {} at least; its working shows which of them decided.",
                size(*smallest)
            ),
            format!("Enter {} or a larger size.", size(*smallest)),
        ),
        NoteKind::ParallelTooSmall {
            run: which,
            entered,
        } => said(
            format!(
                "{} is too small to be laid in parallel, as entered for the {}.",
                size(*entered),
                run(*which)
            ),
            "NEC 2023, 310.10(G): conductors in parallel start at 1/0 AWG.",
            "Enter 1/0 AWG or a larger size, or one set.",
        ),
        NoteKind::SizeNotInTable {
            run: which,
            entered,
        } => said(
            format!(
                "{}, entered for the {}, stands in no row of the ampacity table.",
                size(*entered),
                run(*which)
            ),
            "What it may carry is not known, so it cannot be checked.",
            "Enter a size which the table has.",
        ),
        NoteKind::SizeAtHundredPerCent {
            run: which,
            size: other,
            taken,
        } => said(
            format!(
                "The {} could be {} by another reading; {} is taken.",
                run(*which),
                size(*other),
                size(*taken)
            ),
            "Ventrail asks for 125 % of the current after the factors for ambient and count as well; some designers ask for 100 % there (NEC 2023, 310.15, 430.22).",
            "Nothing needs to be done. Where your reviewer reads it otherwise, say so in the answer.",
        ),
        NoteKind::InsideAirDecides { run: which, air } => said(
            format!(
                "The hot air inside, up to {}, decided the size of the {}.",
                quantity(*air, system),
                run(*which)
            ),
            format!(
                "UL 508A, Table 28.1 stands for air up to {}. Above, the insulation's own ampacity (NEC 2023, Table 310.16) times its ambient factor must reach the same current.",
                quantity(Temperature::celsius(30.0), system)
            ),
            "Nothing needs to be done; cooler air inside may allow a smaller size.",
        ),
        NoteKind::DeviceTypeNotPermitted { by_rule } => said(
            "The drive's instructions do not permit this type of device, so no rating is given.",
            format!(
                "Type and largest rating in the instructions hold (NEC 2023, 430.130(A)). By motor current alone it would be {}.",
                quantity(*by_rule, system)
            ),
            "Choose a type which the instructions permit, or correct the list of types.",
        ),
        NoteKind::LimitNotStandard { limit, taken } => {
            let (limit, taken) = quantities_apart(*limit, *taken, system);
            said(
                format!(
                    "The drive's largest device, {limit}, is no standard rating; {taken} is taken."
                ),
                "The next standard rating up would be above what the drive's instructions permit (NEC 2023, 240.6(A), 430.52(C)(2)).",
                format!("Check that a device of {taken} lets the drive run its load."),
            )
        }
        NoteKind::LimitBelowStandard { limit } => said(
            format!(
                "No standard rating lies at or below the drive's largest device, {}.",
                quantity(*limit, system)
            ),
            "The smallest standard rating of this type is above what the drive's instructions permit (NEC 2023, 240.6(A)).",
            "Check the limit entered, or choose another type of device.",
        ),
        NoteKind::DeviceHeldByDrive { by_rule, taken } => {
            let (by_rule, taken) = quantities_apart(*by_rule, *taken, system);
            said(
                format!("The drive's instructions hold the device at {taken}."),
                format!(
                    "By motor current alone {by_rule} would be permitted; the smaller of the two stands (NEC 2023, 430.52(C)(2))."
                ),
                "Nothing needs to be done.",
            )
        }
        NoteKind::ClassCcEnds { by_rule, taken } => {
            let (by_rule, taken) = quantities_apart(*by_rule, *taken, system);
            said(
                format!(
                    "The rule permits {by_rule}, but Class CC fuses end at {taken}, which is taken."
                ),
                format!(
                    "{taken} still reaches 125 % of the larger of motor current and drive input."
                ),
                "Check that it lets the drive run its load, or choose another type of device.",
            )
        }
        NoteKind::ClassCcTooSmall { needed } => said(
            format!(
                "Class CC fuses end at 30 A, below the {} asked for.",
                quantity(*needed, system)
            ),
            "Fuses under 125 % of the larger of motor current and drive input may open in service.",
            "Choose another type of device.",
        ),
        NoteKind::DeviceBeyondTable { product } => said(
            format!("No standard rating reaches {}.", quantity(*product, system)),
            "The standard ratings of NEC 2023, 240.6(A) end below it, so no device is given.",
            "Check the motor's current; a load so large needs a design of its own.",
        ),
        NoteKind::DeviceAboveMaximum { entered, largest } => {
            let (entered, largest) = quantities_apart(*entered, *largest, system);
            said(
                format!(
                    "The device entered, {entered}, is above the largest permitted, {largest}."
                ),
                "The smaller of the code's largest rating and the drive's own limit holds (NEC 2023, 430.52(C), 430.130(A)).",
                format!("Enter {largest} or a smaller rating."),
            )
        }
        NoteKind::DeviceNotStandard { entered } => said(
            format!("{} is no standard rating.", quantity(*entered, system)),
            "NEC 2023, 240.6(A) does not list it. Other ratings may be used, but none counts as a next standard size.",
            "Confirm that the device is made with this rating, or enter a standard one.",
        ),
        NoteKind::DeviceBelowInput { rating, input } => {
            let (rating, input) = quantities_apart(*rating, *input, system);
            said(
                format!("The device of {rating} is below the drive's input current of {input}."),
                "It would open at full load.",
                "Enter a larger rating as far as is permitted, another type, or another drive.",
            )
        }
        NoteKind::DropUnknown {
            run: which,
            size: wire,
        } => said(
            format!("No voltage drop is worked for the {}.", run(*which)),
            format!(
                "NEC 2023, Chapter 9, Table 9 has no resistance and reactance for {}.",
                size(*wire)
            ),
            "Work this drop by hand, or choose a size of that table.",
        ),
        NoteKind::DropAboveAdvice { drop, advised } => {
            let (drop, advised) = quantities_apart(*drop, *advised, system);
            said(
                format!("The voltage drop of this feeder is {drop}."),
                format!(
                    "{advised} is advised for a branch circuit (NEC 2023, 210.19(A), informational note). It is advice, not a rule."
                ),
                "A larger size or more conductors in parallel lower it; or answer why it does no harm.",
            )
        }
        NoteKind::GroundingCapped {
            run: which,
            size: wire,
        } => said(
            format!(
                "The equipment grounding conductor {} is held at {}.",
                run_where(*which),
                size(*wire)
            ),
            "It need not be larger than the phase conductors of its raceway (NEC 2023, 250.122(A)).",
            "Nothing needs to be done.",
        ),
        NoteKind::GroundingBeyondTable { rating } => said(
            format!(
                "No row of the table reaches a device of {}.",
                quantity(*rating, system)
            ),
            "NEC 2023, Table 250.122 ends below it, so no equipment grounding conductor is given.",
            "Have the equipment grounding conductor sized by an engineer.",
        ),
        NoteKind::ReactorAdvised { percent, reasons } => said(
            format!(
                "Practice asks for an input reactor of {}.",
                quantity(*percent, system)
            ),
            reasons_sentence(reasons),
            "Enter a reactor, or answer why none is wanted. Until it is entered it changes no size and no total.",
        ),
        NoteKind::ReactorBelowAdvice {
            entered,
            advised,
            reasons,
        } => {
            let (entered, advised) = quantities_apart(*entered, *advised, system);
            said(
                format!("Practice asks for an input reactor of {advised}; {entered} is entered."),
                reasons_sentence(reasons),
                format!("Enter {advised}, or answer why less will do."),
            )
        }
        NoteKind::SeveralDrives { drives } => said(
            format!("{drives} drives share this bus."),
            "They disturb each other through the supply they share. By itself that asks for no reactor here.",
            "Nothing needs to be done; think of reactors where other loads on the bus are sensitive.",
        ),
        NoteKind::ReactorReferenceMissing => said(
            "The current to which the reactor's percentage refers is missing.",
            "A percentage gives no inductance without its current.",
            "Enter that current, or let the percentage refer to the drive or to the motor.",
        ),
        NoteKind::DriveTooHot { air, limit } => {
            let (air, limit) = quantities_apart(*air, *limit, system);
            said(
                format!(
                    "The drive stands in air of {air}; it gives its full current up to {limit}."
                ),
                "In hotter air a drive gives less current, by how much its instructions say. This is not worked yet.",
                "Cool the enclosure, or take the drive's derating from its instructions and answer with the current left.",
            )
        }
        NoteKind::DriveTooHigh { altitude, limit } => {
            let (altitude, limit) = quantities_apart(*altitude, *limit, system);
            said(
                format!(
                    "The site lies at {altitude}; the drive gives its full current up to {limit}."
                ),
                "In thinner air a drive gives less current, by how much its instructions say. This is not worked yet.",
                "Take the drive's derating from its instructions and answer with the current left.",
            )
        }
        NoteKind::DeviceLossUnknown { rating } => said(
            format!(
                "The loss of the {} device is not known.",
                quantity(*rating, system)
            ),
            "The limits of IEC 60898-1 and IEC 60269-2 by which it would be assumed do not reach it, so the heat ledger is short of it.",
            "Enter its loss from its data sheet.",
        ),
        NoteKind::SourceHeatUnknown => said(
            "This source of heat has no heat yet.",
            "Neither its heat nor its output with an efficiency is entered, so the heat ledger is short of it.",
            "Enter its heat, or its output.",
        ),
        NoteKind::TableFromMemory { table, rows } => said(
            match rows.as_slice() {
                [] => format!(
                    "Cells of {} are known only from memory.",
                    memory_table(*table)
                ),
                rows => {
                    let rows: Vec<String> =
                        rows.iter().map(|row| memory_row(*table, row)).collect();
                    format!(
                        "Cells of {} are known only from memory: {}.",
                        memory_table(*table),
                        listed(&rows)
                    )
                }
            },
            "No page with them could be read, so they may differ from your copy.",
            "Compare them with your own copy and answer here.",
        ),
        NoteKind::StandingBy { tags } => said(
            format!("{} {} by.", subject(tags), verb(tags, "stands", "stand")),
            "Current and heat are counted in the connected totals only.",
            "Nothing needs to be done; change the duty where it runs together with the others.",
        ),
        NoteKind::ImpedanceAssumed { assumed } => said(
            format!(
                "The transformer's impedance is assumed at {}.",
                quantity(*assumed, system)
            ),
            "Impedances of small transformers run down to 2 %, and a lower one lets more fault current through.",
            "Enter the impedance from the transformer's nameplate.",
        ),
        NoteKind::SupplyVoltageMissing => said(
            "The supply voltage is missing.",
            "Currents, conductors and devices all follow from it; until it is entered nothing is sized.",
            "Enter the voltage between lines of the supply.",
        ),
        NoteKind::StandbyLarger { tags } => said(
            format!(
                "{} {} by and would ask for more than what runs.",
                subject(tags),
                verb(tags, "stands", "stand")
            ),
            "Incoming conductors and main device are worked for what runs together; the largest set that can run at one time decides (NEC 2023, 409.20, 430.24).",
            "Let the larger one run together and its partner stand by, or answer why it never runs.",
        ),
        NoteKind::WallRuleNearLimit { inside, limit } => {
            let (inside, limit) = quantities_apart(*inside, *limit, system);
            said(
                format!("The air inside, {inside}, is within {limit} only by a rule of thumb."),
                "The wall coefficient stands for a rise near 30 K at sea level; at a smaller rise, or in thinner air, the walls carry up to a fifth less.",
                "Leave more room below the limit, or measure.",
            )
        }
        NoteKind::OtherLoadsAtCurrent { names } => said(
            format!(
                "{} {} counted at the current entered.",
                subject(names),
                verb(names, "is", "are")
            ),
            "Heaters take 125 % in the incoming conductors (NEC 2023, 409.20).",
            "For a heater, enter 125 % of its current.",
        ),
        NoteKind::FaultCurrentUnknown => said(
            "The fault current at the panel is not known.",
            "The supply voltage, or the transformer's power, is missing, and no fault current is entered.",
            "Enter the transformer, or the fault current which the utility names.",
        ),
        NoteKind::FaultRunUnknown => said(
            "The fault current at the panel is taken as large as at the start of the incoming run.",
            "Length or size of the incoming run is missing. The run lowers the fault current; without it the larger value stands.",
            "Enter the length of the incoming run and its size.",
        ),
        NoteKind::FaultConstantMissing { size: wire } => said(
            format!(
                "How much the incoming run of {} lowers the fault current is not known.",
                size(*wire)
            ),
            "The point-to-point method has no C constant for this size, metal and raceway here; the value at the start of the run stands.",
            "Nothing needs to be done where the rating inside reaches it; else have the fault current worked by an engineer.",
        ),
        NoteKind::FaultAboveRating {
            fault,
            rating,
            lowest,
        } => {
            let (fault, rating) = quantities_apart(*fault, *rating, system);
            said(
                "The panel cannot claim the fault current it may meet.",
                format!(
                    "{fault} can flow; the lowest rating inside is {rating}{} (NEC 2023, 409.22).",
                    match lowest.as_slice() {
                        [] => String::new(),
                        tags => format!(", of {}", listed(tags)),
                    }
                ),
                "Raise that rating by a combination which the drive's instructions name, or lower the fault current.",
            )
        }
        NoteKind::RatingMissing { tags, main_too } => {
            let mut parts = tags.clone();
            if *main_too {
                parts.push("the main device".to_owned());
            }
            said(
                format!(
                    "No short-circuit current rating is entered for {}.",
                    lower_subject(&parts)
                ),
                "The panel can claim the lowest rating inside and no more; what has none leaves it open (NEC 2023, 409.22, 409.110).",
                "Enter the rating of each drive together with its device, and that of the main device.",
            )
        }
        NoteKind::NoBranchForMain => said(
            "No main device is worked.",
            "No branch device could be worked for the type of the main device: a drive's instructions permit none of it (NEC 2023, 409.21(C)).",
            "Choose another type for the main device, or see to the drives' largest permitted devices.",
        ),
        NoteKind::ReactorLossUnused => said(
            "The reactor's loss is entered, but no reactor.",
            "It counts nowhere until the reactor's percentage is entered too.",
            "Enter the percentage, or clear the loss.",
        ),
        NoteKind::NoMainFits { sum } => said(
            format!(
                "No standard rating lies at or below {}.",
                quantity(*sum, system)
            ),
            "The main device may not be above this sum and is rounded down (NEC 2023, 409.21(C), 240.6(A)).",
            "Choose another type of main device, or check the branch devices.",
        ),
        NoteKind::MainBelowRunning { rating, running } => {
            let (rating, running) = quantities_apart(*rating, *running, system);
            said(
                format!("The main device of {rating} is below the running current of {running}."),
                "It would open when everything runs together. The sum by which it is rounded down counts motor currents, the running current counts the drives' input.",
                "Check the drives' input currents and the branch devices; let fewer feeders run together, or split the panel.",
            )
        }
        NoteKind::MainAboveMaximum { entered, largest } => {
            let (entered, largest) = quantities_apart(*entered, *largest, system);
            said(
                format!(
                    "The main device entered, {entered}, is above the largest permitted, {largest}."
                ),
                "Largest branch device and the full-load currents of the others, rounded down (NEC 2023, 409.21(C)).",
                format!("Enter {largest} or a smaller rating."),
            )
        }
        NoteKind::MainIncomplete { tags } => said(
            format!(
                "{} {} missing in the sums for the incoming conductors or the main device.",
                subject(tags),
                verb(tags, "is", "are")
            ),
            "Motor or drive current is not known there, so incoming conductors and main device come out too small.",
            "Enter motor and drive input current there.",
        ),
        NoteKind::EnclosureUnknown => said(
            "The enclosure's measures are missing.",
            "Without height, width and depth its surface is not known, nor how warm the air inside gets when it is sealed.",
            "Enter the outside height, width and depth.",
        ),
        NoteKind::SunMissing => said(
            "The enclosure stands outdoors, and no heat of the sun is entered.",
            "The sun can add as much heat as a large drive; a temperature without it would be too low.",
            "Enter the heat which the enclosure takes up from the sun; nought where it is always in the shade.",
        ),
        NoteKind::InsideAboveLimit { inside, limit } => {
            let (inside, limit) = quantities_apart(*inside, *limit, system);
            said(
                format!("The air inside reaches {inside}, above its limit of {limit}."),
                "Sealed, all heat must leave by the walls, and they are too small for it.",
                "Choose a larger enclosure, filter fans, or heatsinks through the wall.",
            )
        }
        NoteKind::InsideNotWarmer { limit, ambient } => {
            let (limit, ambient) = quantities_apart(*limit, *ambient, system);
            said(
                format!(
                    "The air inside is to stay at {limit}, and the air around the enclosure reaches {ambient}."
                ),
                "Air which is no cooler than the inside takes no heat away, however much of it is moved.",
                "Allow warmer air inside if every device bears it, or plan a cooling unit.",
            )
        }
        NoteKind::AirflowShort { installed, needed } => {
            let (installed, needed) = quantities_apart(*installed, *needed, system);
            said(
                format!("The fans move {installed} of the {needed} needed."),
                "With less air the inside gets warmer than its limit.",
                "Enter larger fans or more of them, or allow warmer air inside if every device bears it.",
            )
        }
        NoteKind::AirflowUnknown { needed } => said(
            format!(
                "{} must be moved; nothing says what the fans move.",
                quantity(*needed, system)
            ),
            "A fan's catalogue figure is for free air; filters and grilles take a large part of it.",
            "Enter the airflow of the installed fans against their filters.",
        ),
        NoteKind::LedgerIncomplete { tags } => said(
            format!(
                "The heat of {} is missing in the ledger.",
                lower_subject(tags)
            ),
            "Its total, and the temperature and the airflow which follow from it, are too low.",
            "Answer the notes there first.",
        ),
        NoteKind::LoopKeptWarmerEnd { air } => said(
            format!(
                "The air inside is taken as {}, the warmer end of a step.",
                quantity(*air, system)
            ),
            "Hotter air asks for larger conductors, and larger conductors give off less heat. Between two sizes no temperature fits exactly, so the larger size and the warmer air stand.",
            "Nothing needs to be done.",
        ),
    }
}

/// Where a note or an edit is: `P-402, conductors ahead of the drive`. `tag` gives the name of a feeder or a source of heat.
pub fn place(place: &Place, tag: impl Fn(HolderId) -> String) -> String {
    let about = match place.field {
        Field::Run(which, _) => run(which).to_owned(),
        field => lower_first(label(field)),
    };
    match place.holder {
        Holder::Sheet => upper_first(&about),
        Holder::Feeder(id) | Holder::Source(id) => format!("{}, {about}", tag(id)),
    }
}

/// As [`place`], with the field of a run as well: `P-402, ahead of the drive, length one way`.
pub fn place_in_full(place: &Place, tag: impl Fn(HolderId) -> String) -> String {
    match place.holder {
        Holder::Sheet => label(place.field).to_owned(),
        Holder::Feeder(id) | Holder::Source(id) => {
            format!("{}, {}", tag(id), lower_first(label(place.field)))
        }
    }
}

/// A table known from memory, as a sentence names it.
pub const fn memory_table(table: MemoryTable) -> &'static str {
    match table {
        MemoryTable::InsideAmpacity => "UL 508A, Table 28.1 (conductors inside)",
        MemoryTable::FieldAmpacity => "NEC 2023, Table 310.16 (conductors in the field)",
        MemoryTable::FaultConstants => "the C constants of the point-to-point method",
        MemoryTable::BreakerLoss => "the largest losses of breakers (IEC 60898-1)",
        MemoryTable::FuseLoss => "the largest losses of fuse links (IEC 60269-2)",
    }
}

/// A row of such a table as the trade names it: sizes with their scale, ratings with their unit.
fn memory_row(table: MemoryTable, row: &str) -> String {
    match table {
        MemoryTable::InsideAmpacity | MemoryTable::FieldAmpacity | MemoryTable::FaultConstants => {
            WireSize::from_number(row).map_or_else(|| row.to_owned(), size)
        }
        MemoryTable::BreakerLoss | MemoryTable::FuseLoss => with_unit(row, Unit::Ampere),
    }
}

/// A reason to ask for an input reactor, as a clause.
pub const fn reactor_reason(reason: ReactorReason) -> &'static str {
    match reason {
        ReactorReason::SourcePower => {
            "the source is at least ten times the drive's power, and 500 kVA or more"
        }
        ReactorReason::SourceImpedance => "the source's impedance is under 1 % on the drive's base",
        ReactorReason::Unbalance => "the line voltages differ more than drives bear well",
        ReactorReason::Capacitors => "power-factor capacitors are switched on the bus",
        ReactorReason::Surges => "the supply is prone to surges",
    }
}

/// Reasons in a row, as one sentence.
fn reasons_sentence(reasons: &[ReactorReason]) -> String {
    let clauses: Vec<String> = reasons
        .iter()
        .map(|reason| reactor_reason(*reason).to_owned())
        .collect();
    match clauses.as_slice() {
        [] => "Practice asks for it.".to_owned(),
        clauses => format!("{}.", upper_first(&clauses.join("; "))),
    }
}

/// Tags as the subject of a sentence.
fn subject(tags: &[String]) -> String {
    match tags {
        [] => "Something".to_owned(),
        tags => listed(tags),
    }
}

/// The verb behind [`subject`].
fn verb<'a>(tags: &[String], of_one: &'a str, of_many: &'a str) -> &'a str {
    if tags.len() > 1 { of_many } else { of_one }
}

fn said(what: impl Into<String>, why: impl Into<String>, remedy: impl Into<String>) -> NoteWords {
    NoteWords {
        what: what.into(),
        why: why.into(),
        remedy: remedy.into(),
    }
}

/// Tags within a sentence.
fn lower_subject(tags: &[String]) -> String {
    match tags {
        [] => "some part".to_owned(),
        tags => listed(tags),
    }
}

/// A text of the person's on one line, no longer than a sentence bears.
pub(super) fn shortened(text: &str) -> String {
    const MOST: usize = 40;
    let flat = text.split_whitespace().collect::<Vec<_>>().join(" ");
    if flat.chars().count() <= MOST {
        flat
    } else {
        let kept: String = flat.chars().take(MOST).collect();
        format!("{kept}…")
    }
}
