//! Entered sheet in, worked sheet out.
//!
//! Here: the worked sheet, and the order in which the rules are asked. Not here: drawing, storage, sentences.
//! Start with [`work_out`].

mod outcome;

pub use outcome::{
    Ledger, LedgerGroup, LedgerRow, Total, TotalKind, Verdict, Worked, WorkedEnclosure,
    WorkedFeeder, WorkedSource,
};
