//! The form of one feeder: every field of it in groups, each with what was worked from it.

use super::field::{field, named_field};
use super::figure::figures;
use super::grid::{self, Cell};
use super::markup::{button, live, nothing, tag};
use super::names;
use super::spot::{FeederPart, ReactorPart, RunPart, Spot};
use super::state::Page;
use crate::browser::page as window;
use crate::sheet::{Home, fields_of};
use crate::words::{self, page};
use crate::working::{Field, Holder, HolderId, Place, Run};
use leptos::prelude::*;

/// A group of the form.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Group {
    Driven,
    Drive,
    Device,
    Ahead,
    Reactor,
    Behind,
    Heat,
    Remark,
}

const GROUPS: [Group; 8] = [
    Group::Driven,
    Group::Drive,
    Group::Device,
    Group::Ahead,
    Group::Reactor,
    Group::Behind,
    Group::Heat,
    Group::Remark,
];

impl Group {
    const fn head(self) -> &'static str {
        match self {
            Group::Driven => page::group_driven(),
            Group::Drive => page::group_drive(),
            Group::Device => page::group_device(),
            Group::Ahead => page::conductors_ahead(),
            Group::Reactor => page::group_reactor(),
            Group::Behind => page::conductors_behind(),
            Group::Heat => page::group_enclosure(),
            Group::Remark => page::group_remarks(),
        }
    }

    const fn of(field: Field) -> Self {
        use Field as F;
        match field {
            F::Tag | F::Load | F::Running | F::MotorPower | F::MotorCurrent => Group::Driven,
            F::DeviceType | F::DeviceRating | F::ShortCircuitRating => Group::Device,
            F::Run(Run::Behind, _) => Group::Behind,
            F::Run(_, _) => Group::Ahead,
            F::ReactorPercent | F::ReactorReference | F::ReactorReferenceCurrent => Group::Reactor,
            F::DriveLoss | F::HeatsinkShare | F::DeviceLoss | F::ReactorLoss => Group::Heat,
            F::FeederRemark => Group::Remark,
            _ => Group::Drive,
        }
    }

    /// What was worked from the fields of the group.
    fn parts(self) -> Vec<FeederPart> {
        use FeederPart as P;
        match self {
            Group::Driven => vec![P::MotorCurrent],
            Group::Drive => vec![P::DriveInput],
            Group::Device => vec![
                P::DeviceProduct,
                P::DeviceLargest,
                P::DeviceRating,
                P::Disconnect,
            ],
            Group::Ahead => RunPart::ALL.map(P::Ahead).to_vec(),
            Group::Reactor => {
                let mut parts = vec![P::SourceRatio, P::SourceImpedance];
                parts.extend(ReactorPart::ALL.map(P::ReactorEntered));
                parts.extend(ReactorPart::ALL.map(P::ReactorAdvised));
                parts
            }
            Group::Behind => {
                let mut parts = RunPart::ALL.map(P::Behind).to_vec();
                parts.push(P::DropRatio);
                parts
            }
            Group::Heat => vec![
                P::DriveLoss,
                P::DriveInside,
                P::ReactorHeat,
                P::DeviceHeat,
                P::ConductorHeat,
                P::Heat,
            ],
            Group::Remark => Vec::new(),
        }
    }
}

/// The id of the form.
const FORM: &str = "feeder-form";

/// Opens the form of a feeder and goes to its first field.
pub(super) fn open(page: Page, id: HolderId) {
    page.form.set(Some(id));
    let first = Place {
        holder: Holder::Feeder(id),
        field: Field::Tag,
    };
    window::show_soon(FORM.to_owned());
    window::focus_soon(super::field::control_id(first));
}

/// The form, where one is open.
pub(super) fn form(page: Page) -> AnyView {
    live(move || match page.form.get() {
        Some(id) => body(page, id),
        None => nothing(),
    })
}

fn body(page: Page, id: HolderId) -> AnyView {
    let title = move || {
        page.with(|document| page::feeder_form_of(&names::holder(document, Holder::Feeder(id))))
    };
    let close = move || {
        page.form.set(None);
        let cell = page.cursor.get_untracked().filter(|cell| cell.row == id);
        grid::go_to(page, cell.unwrap_or(Cell { row: id, column: 0 }));
    };
    let head = tag("DIV")
        .class("form-head")
        .with(tag("H3").id("feeder-form-head").live_text(title))
        .with(button(move || turn(page, id, Turn::Back)).text(page::feeder_before()))
        .with(button(move || turn(page, id, Turn::On)).text(page::feeder_after()))
        .with(
            button(close)
                .id("close-feeder")
                .text(page::sentence_close()),
        );
    let groups = GROUPS.into_iter().map(|group| {
        let holder = Holder::Feeder(id);
        let fields = fields_of(Home::Feeder)
            .into_iter()
            .filter(|field| Group::of(*field) == group)
            .map(|of| {
                let place = Place { holder, field: of };
                match of {
                    // The legend names the run.
                    Field::Run(_, part) => named_field(page, place, words::run_field(part)),
                    _ => field(page, place),
                }
            });
        let spots = group.parts().into_iter().map(|part| {
            let name = match part {
                FeederPart::Ahead(part) | FeederPart::Behind(part) => part.name().to_owned(),
                part => part.name(),
            };
            (Spot::Feeder(id, part), name)
        });
        tag("FIELDSET")
            .with(tag("LEGEND").text(group.head()))
            .with(tag("DIV").class("fields").children(fields))
            .child(figures(page, spots))
            .done()
    });
    tag("SECTION")
        .id(FORM)
        .class("form")
        .set("aria-labelledby", "feeder-form-head")
        .on("keydown", move |event| {
            if window::key(&event).is_some_and(|key| key.name == "Escape") {
                window::take(&event);
                close();
            }
        })
        .with(head)
        .children(groups)
        .done()
}

/// Which way to turn from one form to another.
#[derive(Clone, Copy)]
enum Turn {
    Back,
    On,
}

/// Turns to the form of the feeder before or after.
fn turn(page: Page, id: HolderId, way: Turn) {
    let rows = page.peek(grid::rows);
    let here = rows.iter().position(|row| *row == id);
    let there = here.and_then(|here| match way {
        Turn::Back => here.checked_sub(1),
        Turn::On => Some(here + 1),
    });
    if let Some(row) = there.and_then(|there| rows.get(there)) {
        grid::mark(
            page,
            Cell {
                row: *row,
                column: 0,
            },
        );
        open(page, *row);
    }
}
