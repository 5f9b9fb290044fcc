//! Conductors of a run: the smallest size which satisfies every rule, and why the next smaller fails.

use crate::math::reaches;
use crate::physics::circuit::{DropRun, Phases, reactive_factor, voltage_drop};
use crate::physics::heat::run_loss;
use crate::quantity::{Current, Length, Power, Ratio, Temperature, Voltage, WireSize};
use crate::sizing::rules;
use crate::tables::nec_chapter_9::{conductor_row, impedance_row};
use crate::tables::nec_conductors::{ambient_factor, ampacity_row, count_factor};
use crate::tables::ul_508a::inside_row;
use crate::tables::{Column, Conduit, Metal};
use crate::working::{
    Amount, Field, Figure, Given, Grade, MarginNote, NoteKind, Origin, Run, RunField, Term,
};
use std::sync::Arc;

/// Where a run lies, with what its rule needs.
#[derive(Debug, Clone, PartialEq)]
pub enum Surrounding {
    /// Inside the enclosure: UL 508A Table 28.1.
    Inside {
        /// Upper edge of the band in which the air inside lies, where it is known. Not the air itself, so that a
        /// size and its working hold for the whole band.
        air: Option<Temperature>,
    },
    /// In the field: NEC Table 310.16.
    Field {
        /// Temperature of the air along the route.
        ambient: Given<Temperature>,
        /// Current-carrying conductors in the raceway.
        carrying: Given<u32>,
    },
}

/// What the terminals of a run are marked with.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Terminal {
    /// No mark: 60 °C up to 100 A, 75 °C above.
    Unmarked,
    /// Marked 60 °C.
    Marked60,
    /// Marked 75 °C.
    Marked75,
}

/// A run to be sized.
#[derive(Debug, Clone, PartialEq)]
pub struct RunInput {
    /// Which run.
    pub run: Run,
    /// Where it lies.
    pub surrounding: Surrounding,
    /// Copper or aluminium.
    pub metal: Given<Metal>,
    /// Conductors in parallel for each phase.
    pub sets: Given<u32>,
    /// Size to be installed, where entered.
    pub size: Option<WireSize>,
    /// Insulation.
    pub insulation: Given<Column>,
    /// Mark at the terminals.
    pub terminal: Given<Terminal>,
    /// Raceway.
    pub conduit: Given<Conduit>,
    /// Length one way, where known.
    pub length: Option<Given<Length>>,
    /// Power factor for the drop.
    pub power_factor: Given<Ratio>,
}

/// Which rule decided a size.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum DecidedBy {
    /// Ampacity in the column of the terminals.
    TerminalColumn,
    /// Ampacity of the insulation's column, corrected for ambient and count.
    CorrectedColumn,
    /// The smallest wire which may be used at all.
    SmallestWire,
    /// Conductors in parallel start at 1/0 AWG.
    ParallelMinimum,
}

/// The size just below the chosen one, and what it fails.
#[derive(Debug, Clone, PartialEq)]
pub struct Rejected {
    /// The size.
    pub size: WireSize,
    /// The rule it fails.
    pub fails: DecidedBy,
    /// The ampacity by which it fails; `None` where it fails by size alone.
    pub ampacity: Option<Arc<Figure>>,
}

/// The smallest size of a run which satisfies every rule.
#[derive(Debug, Clone, PartialEq)]
pub enum ConductorChoice {
    /// A size fits.
    Chosen {
        /// The size.
        size: WireSize,
        /// The rule which decided it.
        decided_by: DecidedBy,
        /// The next smaller size.
        smaller: Option<Rejected>,
    },
    /// No size of the table fits.
    NoneFits {
        /// The largest size tried.
        largest: WireSize,
        /// What all its conductors carry.
        carries: Current,
        /// What they should carry.
        needed: Current,
    },
    /// The insulation may not be used in air so hot.
    TooHot,
    /// Aluminium inside the enclosure has no table.
    NoTable,
}

/// The conductors of a run, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct Conductors {
    /// What was asked for.
    pub input: RunInput,
    /// Ampacity which the run must reach.
    pub required: Arc<Figure>,
    /// The smallest size which fits.
    pub choice: ConductorChoice,
    /// The installed size: as entered, or the smallest which fits, with its working.
    pub size: Option<Arc<Figure>>,
    /// Usable ampacity of all conductors of the installed size.
    pub ampacity: Option<Arc<Figure>>,
    /// Voltage drop.
    pub drop: Option<Arc<Figure>>,
    /// Voltage drop as a share of the supply voltage.
    pub drop_ratio: Option<Arc<Figure>>,
    /// Equipment grounding conductor.
    pub grounding: Option<Arc<Figure>>,
    /// Heat of the run, where it lies inside.
    pub heat: Option<Arc<Figure>>,
}

impl Conductors {
    /// The installed size.
    pub fn installed(&self) -> Option<WireSize> {
        match self.size.as_deref()?.value {
            Amount::Size(size) => Some(size),
            _ => None,
        }
    }

    /// The smallest size which fits.
    pub fn smallest(&self) -> Option<WireSize> {
        match self.choice {
            ConductorChoice::Chosen { size, .. } => Some(size),
            _ => None,
        }
    }
}

/// The ampacity which a run must reach, and the current it carries.
#[derive(Debug, Clone, PartialEq)]
pub struct Demand {
    /// Ampacity asked for: 125 per cent of a current, or a sum which holds it.
    pub ampacity: Arc<Figure>,
    /// The same without the 125 per cent, for the other reading of the corrected column.
    pub plain: Current,
    /// Current for drop and heat.
    pub carried: Given<Current>,
}

/// Smallest copper and aluminium building wire. Source: NEC 2023, 310.3(A); UL 508A asks the same inside.
const fn smallest_wire(metal: Metal) -> WireSize {
    match metal {
        Metal::Copper => WireSize::Awg14,
        Metal::Aluminium => WireSize::Awg12,
    }
}

/// Conductors in parallel start here. Source: NEC 2023, 310.10(G).
const SMALLEST_PARALLEL: WireSize = WireSize::Awg1Over0;

/// Above this required ampacity unmarked terminals are read at 75 °C. Source: NEC 2023, 110.14(C)(1); UL 508A, 29.6.
const UNMARKED_60_UP_TO: Current = Current::amperes(100.0);

/// Sizes a run: the smallest size which satisfies every rule, and what follows from the installed size.
///
/// `None` only where the required figure is of another kind than a current, which no caller makes.
pub fn size_run(
    input: &RunInput,
    demand: &Demand,
    supply_voltage: &Given<Voltage>,
    notes: &mut Vec<MarginNote>,
) -> Option<Conductors> {
    let needed: Current = demand.ampacity.quantity()?;
    let choice = choose(input, needed, needed);
    note_choice(input, needed, &choice, notes);
    let size = installed_size(input, demand, &choice, notes);
    let ampacity = size
        .as_ref()
        .and_then(|(size, _)| usable(input, needed, *size));
    if let (Some(entered), Some(ampacity)) = (input.size, &ampacity) {
        note_entered(input, entered, needed, (ampacity, &choice), notes);
    }
    if let ConductorChoice::Chosen { size: taken, .. } = choice {
        note_other_reading(input, demand.plain, needed, taken, notes);
    }
    let size_figure = size.as_ref().map(|(_, figure)| Arc::clone(figure));
    let installed = size.map(|(size, _)| size);
    let drop = installed.and_then(|size| drop_of(input, demand, size, notes));
    let drop_ratio = drop.as_ref().and_then(|drop| {
        let volts: Voltage = drop.quantity()?;
        let ratio = volts / supply_voltage.value;
        Some(Arc::new(rules::DROP_RATIO.figure(
            ratio,
            [Term::of("dU", drop), supply_voltage.term("U")],
        )))
    });
    let heat = installed.and_then(|size| heat_of(input, demand, size));
    Some(Conductors {
        input: input.clone(),
        required: Arc::clone(&demand.ampacity),
        choice,
        size: size_figure,
        ampacity,
        drop,
        drop_ratio,
        grounding: None,
        heat,
    })
}

/// The column in which the terminals are read.
pub fn terminal_column(terminal: Terminal, needed: Current) -> Column {
    match terminal {
        Terminal::Marked60 => Column::C60,
        Terminal::Marked75 => Column::C75,
        Terminal::Unmarked => {
            if reaches(UNMARKED_60_UP_TO.to_amperes(), needed.to_amperes()) {
                Column::C60
            } else {
                Column::C75
            }
        }
    }
}

/// Both ampacities of one size, all conductors of a phase together. The corrected one is `None` where the air asks for
/// no correction inside.
struct Ampacities {
    terminal: Arc<Figure>,
    corrected: Option<Arc<Figure>>,
}

enum SizeFailure {
    /// The table has no such cell.
    NoCell,
    /// The insulation may not be used in air so hot.
    TooHot,
}

fn ampacities(
    input: &RunInput,
    needed: Current,
    size: WireSize,
) -> Result<Ampacities, SizeFailure> {
    let column = terminal_column(input.terminal.value, needed);
    let (cell, rule) = match input.surrounding {
        // Inside, wire of a cooler insulation than the terminals is read by its insulation.
        Surrounding::Inside { .. } => (
            inside_row(size).and_then(|row| row.ampacity(column.min(input.insulation.value))),
            &rules::INSIDE_CELL,
        ),
        Surrounding::Field { .. } => (
            ampacity_row(size).and_then(|row| row.ampacity(input.metal.value, column)),
            &rules::FIELD_TERMINAL_CELL,
        ),
    };
    let cell = cell.ok_or(SizeFailure::NoCell)?;
    let cell_figure = Arc::new(rule.figure(
        cell,
        [
            Term::constant("size", size),
            Term::constant("column", Temperature::celsius(f64::from(column.celsius()))),
        ],
    ));
    let terminal = Arc::new(rules::TERMINAL_AMPACITY.figure(
        f64::from(input.sets.value) * cell,
        [input.sets.term("n"), Term::of("I_t", &cell_figure)],
    ));
    Ok(Ampacities {
        terminal,
        corrected: corrected(input, size)?,
    })
}

fn corrected(input: &RunInput, size: WireSize) -> Result<Option<Arc<Figure>>, SizeFailure> {
    let insulation = input.insulation.value;
    let (ambient, count) = match &input.surrounding {
        // Table 28.1 stands for 30 °C and less; above, the insulation is tested besides.
        Surrounding::Inside { air } => match air {
            Some(air) if *air > BASE_AMBIENT => (
                Term::constant("T_a", *air),
                Term::constant("k_c", Ratio::of_one(1.0)),
            ),
            _ => return Ok(None),
        },
        Surrounding::Field { ambient, carrying } => {
            let factor = count_factor(carrying.value);
            let figure = rules::COUNT_FACTOR.figure(factor, [carrying.term("N")]);
            (ambient.term("T_a"), Term::of("k_c", &Arc::new(figure)))
        }
    };
    let (Some(temperature), Some(count_ratio)) = (measured(&ambient), measured::<Ratio>(&count))
    else {
        return Ok(None);
    };
    let factor = ambient_factor(temperature, insulation).ok_or(SizeFailure::TooHot)?;
    let cell = ampacity_row(size)
        .and_then(|row| row.ampacity(input.metal.value, insulation))
        .ok_or(SizeFailure::NoCell)?;
    let cell_figure = Arc::new(rules::FIELD_INSULATION_CELL.figure(
        cell,
        [
            Term::constant("size", size),
            Term::constant(
                "column",
                Temperature::celsius(f64::from(insulation.celsius())),
            ),
        ],
    ));
    let factor_figure = Arc::new(rules::AMBIENT_FACTOR.figure(
        factor,
        [
            ambient,
            Term::constant(
                "column",
                Temperature::celsius(f64::from(insulation.celsius())),
            ),
        ],
    ));
    let sum = f64::from(input.sets.value) * (factor * (count_ratio * cell));
    Ok(Some(Arc::new(rules::CORRECTED_AMPACITY.figure(
        sum,
        [
            input.sets.term("n"),
            Term::of("I_i", &cell_figure),
            Term::of("k_a", &factor_figure),
            count,
        ],
    ))))
}

/// The ambient for which Tables 310.16 and 28.1 are printed.
const BASE_AMBIENT: Temperature = Temperature::celsius(30.0);

fn measured<Q: crate::quantity::Quantity>(term: &Term) -> Option<Q> {
    match term.amount {
        Amount::Measured { si, kind } if kind == Q::KIND => Some(Q::from_si(si)),
        _ => None,
    }
}

/// The usable ampacity of a size: the smaller of its two ampacities.
fn usable(input: &RunInput, needed: Current, size: WireSize) -> Option<Arc<Figure>> {
    let both = ampacities(input, needed, size).ok()?;
    let Some(corrected) = both.corrected else {
        return Some(both.terminal);
    };
    let (terminal_amperes, corrected_amperes): (Current, Current) =
        (both.terminal.quantity()?, corrected.quantity()?);
    let smaller = if corrected_amperes < terminal_amperes {
        corrected_amperes
    } else {
        terminal_amperes
    };
    Some(Arc::new(rules::USABLE_AMPACITY.figure(
        smaller,
        [Term::of("I_T", &both.terminal), Term::of("I_C", &corrected)],
    )))
}

/// Why a size does not fit, or that it does.
enum Trial {
    Fits,
    Fails(DecidedBy, Option<Arc<Figure>>),
    Impossible(SizeFailure),
}

fn try_size(
    input: &RunInput,
    size: WireSize,
    by_terminals: Current,
    by_insulation: Current,
) -> Trial {
    if size < smallest_wire(input.metal.value) {
        return Trial::Fails(DecidedBy::SmallestWire, None);
    }
    if input.sets.value > 1 && size < SMALLEST_PARALLEL {
        return Trial::Fails(DecidedBy::ParallelMinimum, None);
    }
    let both = match ampacities(input, by_terminals, size) {
        Ok(both) => both,
        Err(failure) => return Trial::Impossible(failure),
    };
    let short = |figure: &Arc<Figure>, needed: Current| {
        figure
            .quantity::<Current>()
            .filter(|carries| !reaches(carries.to_amperes(), needed.to_amperes()))
    };
    let terminal_short = short(&both.terminal, by_terminals);
    let corrected_short = both
        .corrected
        .as_ref()
        .and_then(|figure| short(figure, by_insulation));
    match (terminal_short, corrected_short, both.corrected) {
        (None, None, _) => Trial::Fits,
        // Where both fall short, the lower one tells more.
        (terminal, Some(corrected), Some(figure))
            if terminal.is_none_or(|terminal| corrected < terminal) =>
        {
            Trial::Fails(DecidedBy::CorrectedColumn, Some(figure))
        }
        _ => Trial::Fails(DecidedBy::TerminalColumn, Some(both.terminal)),
    }
}

fn choose(input: &RunInput, by_terminals: Current, by_insulation: Current) -> ConductorChoice {
    if matches!(input.surrounding, Surrounding::Inside { .. })
        && input.metal.value == Metal::Aluminium
    {
        return ConductorChoice::NoTable;
    }
    let mut smaller = None;
    let mut largest = None;
    for size in WireSize::ALL {
        match try_size(input, size, by_terminals, by_insulation) {
            Trial::Fits => {
                let decided_by = smaller
                    .as_ref()
                    .map_or(DecidedBy::SmallestWire, |rejected: &Rejected| {
                        rejected.fails
                    });
                return ConductorChoice::Chosen {
                    size,
                    decided_by,
                    smaller,
                };
            }
            Trial::Fails(fails, ampacity) => {
                if ampacity.is_some() {
                    largest = Some(size);
                }
                smaller = Some(Rejected {
                    size,
                    fails,
                    ampacity,
                });
            }
            Trial::Impossible(SizeFailure::TooHot) => return ConductorChoice::TooHot,
            Trial::Impossible(SizeFailure::NoCell) => {}
        }
    }
    let largest = largest.unwrap_or(SMALLEST_PARALLEL);
    let carries = usable(input, by_terminals, largest)
        .and_then(|figure| figure.quantity())
        .unwrap_or(Current::amperes(0.0));
    ConductorChoice::NoneFits {
        largest,
        carries,
        needed: by_terminals,
    }
}

fn installed_size(
    input: &RunInput,
    demand: &Demand,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) -> Option<(WireSize, Arc<Figure>)> {
    let needed: Current = demand.ampacity.quantity()?;
    let chosen = match choice {
        ConductorChoice::Chosen { size, smaller, .. } => {
            let mut terms = vec![Term::of("I_z", &demand.ampacity), input.sets.term("n")];
            terms.extend(usable(input, needed, *size).map(|figure| Term::of("I_u", &figure)));
            if let Some(rejected) = smaller {
                terms.push(Term::constant("next smaller", rejected.size));
                terms.extend(
                    rejected
                        .ampacity
                        .as_ref()
                        .map(|figure| Term::of("its I_u", figure)),
                );
            }
            Some((*size, Arc::new(rules::CONDUCTOR_SIZE.figure(*size, terms))))
        }
        _ => None,
    };
    let Some(entered) = input.size else {
        return chosen;
    };
    let field = Field::Run(input.run, RunField::Size);
    let mut terms = vec![
        Given::entered(field, entered).term("size"),
        Term::of("I_z", &demand.ampacity),
        input.sets.term("n"),
    ];
    match usable(input, needed, entered) {
        Some(figure) => terms.push(Term::of("I_u", &figure)),
        None if *choice != ConductorChoice::NoTable && *choice != ConductorChoice::TooHot => {
            notes.push(MarginNote::new(
                Grade::Stop,
                field,
                NoteKind::SizeNotInTable {
                    run: input.run,
                    entered,
                },
            ));
        }
        None => {}
    }
    terms.extend(chosen.map(|(_, figure)| Term::of("smallest", &figure)));
    Some((
        entered,
        Arc::new(rules::CONDUCTOR_ENTERED.figure(entered, terms)),
    ))
}

fn note_choice(
    input: &RunInput,
    needed: Current,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) {
    let run = input.run;
    let (part, kind) = match choice {
        ConductorChoice::Chosen { .. } => {
            note_inside_air(input, needed, choice, notes);
            return;
        }
        ConductorChoice::NoneFits {
            largest,
            carries,
            needed,
        } => (
            RunField::Sets,
            NoteKind::NoConductorFits {
                run,
                needed: *needed,
                carries: *carries,
                largest: *largest,
            },
        ),
        ConductorChoice::TooHot => {
            let ambient = match &input.surrounding {
                Surrounding::Field { ambient, .. } => ambient.value,
                Surrounding::Inside { air } => air.unwrap_or(BASE_AMBIENT),
            };
            (
                RunField::Insulation,
                NoteKind::AmbientBeyondInsulation { run, ambient },
            )
        }
        ConductorChoice::NoTable => (RunField::Metal, NoteKind::AluminiumInside { run }),
    };
    notes.push(MarginNote::new(Grade::Stop, Field::Run(run, part), kind));
}

/// Says where the hot air inside, not Table 28.1 as printed, decided the size.
fn note_inside_air(
    input: &RunInput,
    needed: Current,
    choice: &ConductorChoice,
    notes: &mut Vec<MarginNote>,
) {
    let Surrounding::Inside { air: Some(air) } = input.surrounding else {
        return;
    };
    let cool = RunInput {
        surrounding: Surrounding::Inside { air: None },
        ..input.clone()
    };
    let in_cool_air = choose(&cool, needed, needed);
    if let (ConductorChoice::Chosen { size: hot, .. }, ConductorChoice::Chosen { size: cool, .. }) =
        (choice, &in_cool_air)
        && hot != cool
    {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Insulation),
            NoteKind::InsideAirDecides {
                run: input.run,
                air,
            },
        ));
    }
}

fn note_entered(
    input: &RunInput,
    entered: WireSize,
    needed: Current,
    (ampacity, choice): (&Arc<Figure>, &ConductorChoice),
    notes: &mut Vec<MarginNote>,
) {
    let run = input.run;
    let field = Field::Run(run, RunField::Size);
    if input.sets.value > 1 && entered < SMALLEST_PARALLEL {
        notes.push(MarginNote::new(
            Grade::Stop,
            field,
            NoteKind::ParallelTooSmall { run, entered },
        ));
    }
    let carries: Option<Current> = ampacity.quantity();
    let is_short =
        carries.is_some_and(|carries| !reaches(carries.to_amperes(), needed.to_amperes()));
    let is_thin = entered < smallest_wire(input.metal.value);
    if let ConductorChoice::Chosen { size: smallest, .. } = choice
        && (is_short || is_thin)
    {
        notes.push(
            MarginNote::new(
                Grade::Stop,
                field,
                NoteKind::ConductorTooSmall {
                    run,
                    entered,
                    smallest: *smallest,
                },
            )
            .about(ampacity),
        );
    }
}

/// Some test the corrected column at 100 per cent of the current only: where that gives another size, it is said.
fn note_other_reading(
    input: &RunInput,
    plain: Current,
    needed: Current,
    taken: WireSize,
    notes: &mut Vec<MarginNote>,
) {
    if !matches!(input.surrounding, Surrounding::Field { .. }) {
        return;
    }
    if let ConductorChoice::Chosen { size, .. } = choose(input, needed, plain)
        && size != taken
    {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Size),
            NoteKind::SizeAtHundredPerCent {
                run: input.run,
                size,
                taken,
            },
        ));
    }
}

fn drop_of(
    input: &RunInput,
    demand: &Demand,
    size: WireSize,
    notes: &mut Vec<MarginNote>,
) -> Option<Arc<Figure>> {
    let length = input.length.as_ref()?;
    let cell =
        impedance_row(size).and_then(|row| row.impedance(input.metal.value, input.conduit.value));
    let Some(impedance) = cell else {
        notes.push(MarginNote::new(
            Grade::Note,
            Field::Run(input.run, RunField::Size),
            NoteKind::DropUnknown {
                run: input.run,
                size,
            },
        ));
        return None;
    };
    let row = || Term::constant("size", size);
    let resistance = Arc::new(rules::TABLE_9_RESISTANCE.figure(impedance.resistance, [row()]));
    let reactance = Arc::new(rules::TABLE_9_REACTANCE.figure(impedance.reactance, [row()]));
    let cosphi = &input.power_factor;
    let sinphi = Arc::new(
        rules::REACTIVE_FACTOR.figure(reactive_factor(cosphi.value), [cosphi.term("cosphi")]),
    );
    let drop = voltage_drop(
        Phases::Three,
        demand.carried.value,
        cosphi.value,
        DropRun {
            resistance: impedance.resistance,
            reactance: impedance.reactance,
            length: length.value,
            sets: input.sets.value,
        },
    );
    Some(Arc::new(rules::VOLTAGE_DROP.figure(
        drop,
        [
            demand.carried.term("I"),
            Term::of("R", &resistance),
            cosphi.term("cosphi"),
            Term::of("X", &reactance),
            Term::of("sinphi", &sinphi),
            length.term("L"),
            input.sets.term("n"),
        ],
    )))
}

/// Heat of a run inside; runs in the field warm something else.
fn heat_of(input: &RunInput, demand: &Demand, size: WireSize) -> Option<Arc<Figure>> {
    if !matches!(input.surrounding, Surrounding::Inside { .. }) {
        return None;
    }
    let length = input.length.as_ref()?;
    let resistance = conductor_row(size)?.resistance(input.metal.value);
    let cell =
        Arc::new(rules::TABLE_8_RESISTANCE.figure(resistance, [Term::constant("size", size)]));
    let heat: Power = run_loss(
        demand.carried.value,
        resistance,
        length.value,
        input.sets.value,
    );
    Some(Arc::new(rules::RUN_HEAT.figure(
        heat,
        [
            demand.carried.term("I"),
            Term::of("R", &cell),
            length.term("L"),
            input.sets.term("n"),
        ],
    )))
}

/// The demand of a conductor which carries one current: 125 per cent of it, by `rule`.
pub fn demand_of(
    rule: &'static crate::working::Rule,
    symbol: &'static str,
    current: &Given<Current>,
) -> Demand {
    let ampacity = crate::physics::circuit::share_of(CONTINUOUS, current.value);
    Demand {
        ampacity: Arc::new(rule.figure(ampacity, [current.term(symbol)])),
        plain: current.value,
        carried: current.clone(),
    }
}

/// The 125 per cent of Article 430.
pub(crate) const CONTINUOUS: Ratio = Ratio::of_one(1.25);

/// The rows of ampacity tables from memory on which a run rests: whether it is inside, and the field cell's origin.
pub fn cells_from_memory(conductors: &Conductors) -> Option<(bool, WireSize)> {
    let size = conductors.installed()?;
    match conductors.input.surrounding {
        Surrounding::Inside { .. } => Some((true, size)),
        Surrounding::Field { .. } => ampacity_row(size)
            .filter(|row| row.known == crate::working::Known::FromMemory)
            .map(|_| (false, size)),
    }
}

impl Conductors {
    /// Whether the installed size was entered.
    pub fn is_entered(&self) -> bool {
        self.size.as_ref().is_some_and(|figure| {
            figure
                .terms
                .iter()
                .any(|term| matches!(term.origin, Origin::Entered(Field::Run(_, RunField::Size))))
        })
    }
}
