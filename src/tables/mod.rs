//! Published values as constants, one file for each publication, with lookups which say which row was taken.
//!
//! Here: tables of the NEC, UL 508A and others, and the keys by which they are read. Not here: choices between rows
//! (`sizing`). Every table is compared cell by cell with `tests/published/tables/`.

pub mod device_losses;
pub mod enclosure;
pub mod fault_constants;
pub mod nec_chapter_9;
pub mod nec_conductors;
pub mod nec_motors;
pub mod nec_ratings;
pub mod ul_508a;

pub use crate::working::Known;

/// An edition of the NEC which is worked. Rules which changed between editions take it as their key.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Edition {
    /// The edition of 2023.
    Nec2023,
}

/// What conductors are made of.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Metal {
    /// Copper.
    Copper,
    /// Aluminium.
    Aluminium,
}

/// What a raceway is made of.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Conduit {
    /// Steel.
    Steel,
    /// PVC.
    Pvc,
    /// Aluminium.
    Aluminium,
}

/// A temperature column of an ampacity table.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Column {
    /// 60 °C.
    C60,
    /// 75 °C.
    C75,
    /// 90 °C.
    C90,
}

impl Column {
    /// The temperature of the column, degrees Celsius.
    pub const fn celsius(self) -> u32 {
        match self {
            Column::C60 => 60,
            Column::C75 => 75,
            Column::C90 => 90,
        }
    }
}

/// The types of branch device which Table 430.52(C)(1) and the drives' instructions name.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum DeviceType {
    /// Dual-element time-delay fuse.
    TimeDelayFuse,
    /// Nontime-delay fuse.
    NontimeDelayFuse,
    /// Class CC fuse.
    ClassCcFuse,
    /// Inverse time breaker.
    InverseTimeBreaker,
}
