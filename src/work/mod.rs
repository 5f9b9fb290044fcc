//! Entered sheet in, worked sheet out.
//!
//! Here: the worked sheet, and the order in which the rules are asked: feeders one by one, then the enclosure loop, then
//! the panel. Not here: drawing, storage, sentences. Start with [`work_out`].

mod enclosure;
mod feeder;
mod ledger;
mod notes;
mod outcome;
mod panel;
mod sheet;
mod totals;

pub use outcome::{
    Ledger, LedgerGroup, LedgerRow, Total, TotalKind, Verdict, Worked, WorkedEnclosure,
    WorkedFeeder, WorkedSource,
};
pub use sheet::{work_again, work_out};
