//! The columns of the feeder list, and what stands in each cell.

use super::shown::{Holding, Shown, Writing, bare};
use super::spot::{FeederPart, ReactorPart, RunPart, Spot, run_of};
use crate::sheet::UnitSystem;
use crate::sizing::conductor::Conductors;
use crate::words::{self, page};
use crate::work::WorkedFeeder;
use crate::working::{Amount, Field, Holder, HolderId, Ink, Place, Run, RunField};

/// A column of the feeder list.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Column {
    /// What stands in it.
    pub(super) content: Content,
    /// The group in whose head it stands.
    pub(super) group: Group,
    /// Whether its values are numbers and stand at the right.
    pub(super) is_number: bool,
}

/// What stands in a column.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Content {
    /// A field which can be entered; where it is not, the figure which stands in for it, if any.
    Field(Field, Option<FeederPart>),
    /// Rating of the branch device.
    Device,
    /// Conductors of a run.
    Conductors(Run),
    /// Grounding conductor of the run behind the drive.
    Grounding,
    /// Input reactor.
    Reactor,
    /// A worked number.
    Part(FeederPart),
    /// Marks of the margin notes.
    Marks,
}

/// A group of columns.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Group {
    Driven,
    Ahead,
    Behind,
    Enclosure,
}

impl Group {
    /// The groups in their order, each with the number of its columns.
    pub(super) fn spans() -> Vec<(Group, usize)> {
        [Group::Driven, Group::Ahead, Group::Behind, Group::Enclosure]
            .into_iter()
            .map(|group| {
                let columns = COLUMNS.iter().filter(|column| column.group == group);
                (group, columns.count())
            })
            .collect()
    }

    /// The head of the group.
    pub(super) const fn head(self) -> &'static str {
        match self {
            Group::Driven => page::group_driven(),
            Group::Ahead => page::group_ahead(),
            Group::Behind => page::group_behind(),
            Group::Enclosure => page::group_enclosure(),
        }
    }
}

const fn text(content: Content, group: Group) -> Column {
    Column {
        content,
        group,
        is_number: false,
    }
}

const fn number(content: Content, group: Group) -> Column {
    Column {
        content,
        group,
        is_number: true,
    }
}

const fn field(field: Field) -> Content {
    Content::Field(field, None)
}

/// The columns in their order. The first is the head of its row.
pub(super) const COLUMNS: [Column; 17] = [
    text(field(Field::Tag), Group::Driven),
    text(field(Field::Load), Group::Driven),
    text(field(Field::Running), Group::Driven),
    number(field(Field::MotorPower), Group::Driven),
    number(
        Content::Field(Field::MotorCurrent, Some(FeederPart::MotorCurrent)),
        Group::Driven,
    ),
    number(
        Content::Field(Field::DriveInput, Some(FeederPart::DriveInput)),
        Group::Driven,
    ),
    text(field(Field::DeviceType), Group::Ahead),
    number(Content::Device, Group::Ahead),
    number(
        field(Field::Run(Run::Ahead, RunField::Length)),
        Group::Ahead,
    ),
    text(Content::Conductors(Run::Ahead), Group::Ahead),
    text(Content::Reactor, Group::Ahead),
    number(
        field(Field::Run(Run::Behind, RunField::Length)),
        Group::Behind,
    ),
    text(Content::Conductors(Run::Behind), Group::Behind),
    text(Content::Grounding, Group::Behind),
    number(Content::Part(FeederPart::DropRatio), Group::Behind),
    number(Content::Part(FeederPart::Heat), Group::Enclosure),
    text(Content::Marks, Group::Enclosure),
];

impl Column {
    /// The field which is entered in this column.
    pub(super) const fn field(self) -> Option<Field> {
        match self.content {
            Content::Field(field, _) => Some(field),
            _ => None,
        }
    }

    /// Whether the column begins its group.
    pub(super) fn begins_group(self, before: Option<Column>) -> bool {
        before.is_some_and(|before| before.group != self.group)
    }

    /// The head of the column.
    pub(super) const fn head(self) -> &'static str {
        match self.content {
            Content::Field(field, _) => words::head(field),
            Content::Device => words::head(Field::DeviceRating),
            Content::Conductors(_) => page::head_conductors(),
            Content::Grounding => page::head_ground(),
            Content::Reactor => page::head_reactor(),
            Content::Part(FeederPart::DropRatio) => page::head_drop(),
            Content::Part(_) => page::head_heat(),
            Content::Marks => page::head_margin(),
        }
    }

    /// The unit of the column, as its symbol.
    pub(super) fn unit(self, system: UnitSystem) -> &'static str {
        match self.content {
            Content::Field(field, _) => words::field_symbol(field, system),
            Content::Device => words::field_symbol(Field::DeviceRating, system),
            Content::Reactor => page::unit_reactor(),
            Content::Part(FeederPart::DropRatio) => page::unit_drop(),
            Content::Part(_) => page::unit_heat(),
            Content::Conductors(_) | Content::Grounding | Content::Marks => "",
        }
    }

    /// What is under the cursor in this column of a feeder.
    pub(super) fn spot(self, id: HolderId, feeder: Option<&WorkedFeeder>) -> Option<Spot> {
        let part = match self.content {
            Content::Field(_, Some(part)) | Content::Part(part) => part,
            Content::Field(field, None) => {
                return Some(Spot::Field(Place {
                    holder: Holder::Feeder(id),
                    field,
                }));
            }
            Content::Device => FeederPart::DeviceRating,
            Content::Conductors(Run::Ahead) => FeederPart::Ahead(RunPart::Size),
            Content::Conductors(_) => FeederPart::Behind(RunPart::Size),
            Content::Grounding => FeederPart::Behind(RunPart::Grounding),
            Content::Reactor => match feeder.map(|feeder| &feeder.reactor) {
                Some(reactor) if reactor.entered.is_some() => {
                    FeederPart::ReactorEntered(ReactorPart::Inductance)
                }
                Some(reactor) if reactor.advised.is_some() => {
                    FeederPart::ReactorAdvised(ReactorPart::Inductance)
                }
                // Why none is asked for.
                _ => FeederPart::SourceImpedance,
            },
            Content::Marks => return None,
        };
        Some(Spot::Feeder(id, part))
    }

    /// What stands in this column of a feeder.
    pub(super) fn shown(self, holding: Holding<'_>, feeder: &WorkedFeeder) -> Shown {
        let system = holding.system;
        match self.content {
            Content::Field(field, part) => {
                let place = Place {
                    holder: Holder::Feeder(feeder.id),
                    field,
                };
                let traced = part.and_then(|part| part.traced(feeder));
                holding.at(place, traced.as_ref(), Writing::Bare)
            }
            Content::Device => match FeederPart::DeviceRating.traced(feeder) {
                Some(rating) => bare(&rating, system),
                None if feeder.device.is_some() => no_answer(),
                None => Shown::Nothing,
            },
            Content::Conductors(run) => run_of(feeder, run).map_or(Shown::Nothing, conductors),
            Content::Grounding => {
                let size = FeederPart::Behind(RunPart::Grounding).traced(feeder);
                size.map_or(Shown::Nothing, |size| bare(&size, system))
            }
            Content::Reactor => reactor(feeder, system),
            Content::Part(part) => part.traced(feeder).map_or(Shown::Nothing, |traced| {
                let traced = bare(&traced, system);
                match (part, traced) {
                    (FeederPart::Heat, Shown::Value(ink, text)) if !feeder.is_running => {
                        Shown::Value(ink, page::standing_by_value(&text))
                    }
                    (_, traced) => traced,
                }
            }),
            Content::Marks => Shown::Nothing,
        }
    }
}

/// The installed conductors of a run, or that none fits.
pub(super) fn conductors(run: &Conductors) -> Shown {
    let ink = if run.is_entered() {
        Ink::Entered
    } else {
        Ink::Worked
    };
    match words::installed(run) {
        Some(text) => Shown::Value(ink, text),
        None => no_answer(),
    }
}

/// The entered reactor, the advised one in brackets, or none.
pub(super) fn reactor(feeder: &WorkedFeeder, system: UnitSystem) -> Shown {
    let reactor = &feeder.reactor;
    let percent = |share: crate::quantity::Ratio| words::amount(Amount::from(share), system);
    if let Some(entered) = &reactor.entered {
        let inductance = words::bare(entered.inductance.value, system);
        let text = page::reactor_of(&percent(entered.percent), &inductance);
        return Shown::Value(Ink::Worked, text);
    }
    if let Some(advised) = &reactor.advised {
        return Shown::Value(
            Ink::Worked,
            page::reactor_only_advised(&percent(advised.percent)),
        );
    }
    if feeder.drive_input.is_none() {
        return Shown::Nothing;
    }
    let text = if reactor.is_open {
        page::reactor_open()
    } else {
        page::reactor_none()
    };
    Shown::Value(Ink::Worked, text.to_owned())
}

fn no_answer() -> Shown {
    Shown::Value(Ink::Worked, page::none_fits().to_owned())
}
