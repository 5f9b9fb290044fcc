//! Rows of published and independent values, put through the core.
//!
//! Here: the reader of such rows, the topics they may have, and the comparison. Not here: any formula or table of the
//! trade: a topic hands a row's inputs to public functions of the core and reads what they give.
//! Start with [`rows::read`] and [`verdict::judge`].

#![allow(
    dead_code,
    reason = "the example and each test take their own part of this module"
)]

pub mod folder;
pub mod keys;
pub mod rows;
pub mod topics;
pub mod verdict;
