//! Largest losses of protective devices at their rating: breakers by IEC 60898-1, fuse links by IEC 60269-2 (gG, NH).
//!
//! Both tables are known from memory, and both are limits of their own kind of device. Fuses of North American classes are
//! not of the NH sizes; the limit of the NH size which is made for their rating stands in for them, and a real link can
//! lie above it: the loss is assumed until it is typed.

use crate::quantity::{Current, Power};

/// The largest loss of a device up to a rating.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct LossLimit {
    /// Largest rating for which the limit holds.
    pub up_to: Current,
    /// Largest loss of one pole or link at its rating.
    pub loss: Power,
}

/// The loss limit of one pole of a breaker of `rating`; `None` above 125 A.
pub fn breaker_pole(rating: Current) -> Option<LossLimit> {
    BREAKER_POLES
        .iter()
        .find(|row| rating <= row.up_to)
        .copied()
}

/// The loss limit of one fuse link of `rating`; `None` above 1250 A.
pub fn fuse_link(rating: Current) -> Option<LossLimit> {
    FUSE_LINKS.iter().find(|row| rating <= row.up_to).copied()
}

const fn limit(amperes: f64, watts: f64) -> LossLimit {
    LossLimit {
        up_to: Current::amperes(amperes),
        loss: Power::watts(watts),
    }
}

/// IEC 60898-1, largest loss for each pole: up to amperes, watts.
#[rustfmt::skip]
pub static BREAKER_POLES: [LossLimit; 9] = [
    limit(10.0, 3.0),
    limit(16.0, 3.5),
    limit(25.0, 4.5),
    limit(32.0, 6.0),
    limit(40.0, 7.5),
    limit(50.0, 9.0),
    limit(63.0, 13.0),
    limit(100.0, 15.0),
    limit(125.0, 20.0),
];

/// IEC 60269-2, largest loss of a gG link by NH size: the largest rating made in the size, watts. Sizes 000, 00, 1, 2,
/// 3, 4, 4a; size 0 is left out because size 00 covers its ratings with less.
#[rustfmt::skip]
pub static FUSE_LINKS: [LossLimit; 7] = [
    limit(100.0, 7.5),
    limit(160.0, 12.0),
    limit(250.0, 23.0),
    limit(400.0, 34.0),
    limit(630.0, 48.0),
    limit(1000.0, 90.0),
    limit(1250.0, 110.0),
];
