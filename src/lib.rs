//! Ventrail: a worksheet for planning a control panel of variable frequency drives.
//!
//! The rooms below are listed in the order in which they may use each other: a room uses only rooms
//! above it. DEVELOPERS.md holds the map, and `tests/rooms.rs` keeps the order.
//! Start reading at [`work::work_out`], the one function which turns an entered sheet into a worked one.

pub mod math;
pub mod quantity;
pub mod working;

pub mod tables;

pub mod physics;

pub mod sizing;

pub mod sheet;

pub mod assume;

pub mod work;

pub mod entry;

pub mod file;

pub mod words;

#[cfg(feature = "ui")]
pub mod browser;

#[cfg(feature = "ui")]
pub mod ui;
