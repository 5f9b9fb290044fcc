//! Goes to a place of the sheet, wherever on the page it can be entered.

use super::columns::COLUMNS;
use super::conditions::{self, Group};
use super::field::control_id;
use super::grid::Cell;
use super::state::Page;
use crate::browser::page as window;
use crate::working::{Holder, Place};
use leptos::prelude::*;

/// Puts the focus where `place` is entered, and opens what is closed around it.
pub(super) fn place(page: Page, place: Place) {
    page.is_margin_open.set(false);
    match place.holder {
        Holder::Sheet => {
            if let Some(group) = Group::of(place.field) {
                conditions::open(page, group, Some(place.field));
            }
        }
        Holder::Source(_) => window::focus_soon(control_id(place)),
        Holder::Feeder(row) => {
            let column = COLUMNS
                .iter()
                .position(|column| column.field() == Some(place.field));
            match column {
                Some(column) => window::focus_soon(Cell { row, column }.id()),
                None => {
                    page.form.set(Some(row));
                    window::focus_soon(control_id(place));
                }
            }
        }
    }
}
