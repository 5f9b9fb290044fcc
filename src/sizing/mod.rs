//! Choices: conductor, device, reactor, incoming circuit, fault current, heat and air. Formulas and tables become
//! outcomes with figures and findings.
//!
//! Here: small input structs and the outcome of each rule family. Not here: the sheet, feeders, sentences.
//! Start with [`conductor::size_run`] and [`device::size_branch_device`].

pub mod air;
pub mod basis;
pub mod conductor;
pub mod current;
pub mod device;
pub mod fault;
pub mod grounding;
pub mod heat;
pub mod panel;
pub mod reactor;
pub mod rules;
