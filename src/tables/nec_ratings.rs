//! NEC 2023, 240.6(A): standard ampere ratings of fuses and inverse time breakers.

use super::{DeviceType, Edition};
use crate::math::{agree, reaches};
use crate::quantity::Current;

/// A standard rating, and for which devices it is one.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct StandardRating {
    /// The rating.
    pub rating: Current,
    /// Whether inverse time breakers have it in 2023.
    pub is_breaker_rating_2023: bool,
}

/// The largest rating in which Class CC fuses are made.
pub const LARGEST_CLASS_CC: Current = Current::amperes(30.0);

/// The standard ratings for `device`, smallest first.
pub fn ratings(device: DeviceType, edition: Edition) -> impl Iterator<Item = Current> + Clone {
    STANDARD_RATINGS
        .iter()
        .filter(move |row| match (device, edition) {
            (DeviceType::InverseTimeBreaker, Edition::Nec2023) => row.is_breaker_rating_2023,
            (DeviceType::TimeDelayFuse | DeviceType::NontimeDelayFuse, _) => true,
            (DeviceType::ClassCcFuse, _) => row.rating <= LARGEST_CLASS_CC,
        })
        .map(|row| row.rating)
}

/// The smallest standard rating at or above `current`.
pub fn at_or_above(current: Current, device: DeviceType, edition: Edition) -> Option<Current> {
    ratings(device, edition).find(|rating| reaches(rating.to_amperes(), current.to_amperes()))
}

/// The largest standard rating at or below `current`.
pub fn at_or_below(current: Current, device: DeviceType, edition: Edition) -> Option<Current> {
    ratings(device, edition)
        .filter(|rating| reaches(current.to_amperes(), rating.to_amperes()))
        .last()
}

/// Whether `current` is a standard rating for `device`.
pub fn is_standard(current: Current, device: DeviceType, edition: Edition) -> bool {
    at_or_above(current, device, edition)
        .is_some_and(|rating| agree(rating.to_amperes(), current.to_amperes()))
}

const fn row(amperes: f64, is_breaker_rating_2023: bool) -> StandardRating {
    StandardRating {
        rating: Current::amperes(amperes),
        is_breaker_rating_2023,
    }
}

/// 240.6(A). The 10 A breaker is new in 2023; 1, 3, 6 and 601 A are ratings of fuses alone.
#[rustfmt::skip]
pub static STANDARD_RATINGS: [StandardRating; 42] = [
    row(1.0, false),
    row(3.0, false),
    row(6.0, false),
    row(10.0, true),
    row(15.0, true),
    row(20.0, true),
    row(25.0, true),
    row(30.0, true),
    row(35.0, true),
    row(40.0, true),
    row(45.0, true),
    row(50.0, true),
    row(60.0, true),
    row(70.0, true),
    row(80.0, true),
    row(90.0, true),
    row(100.0, true),
    row(110.0, true),
    row(125.0, true),
    row(150.0, true),
    row(175.0, true),
    row(200.0, true),
    row(225.0, true),
    row(250.0, true),
    row(300.0, true),
    row(350.0, true),
    row(400.0, true),
    row(450.0, true),
    row(500.0, true),
    row(600.0, true),
    row(601.0, false),
    row(700.0, true),
    row(800.0, true),
    row(1000.0, true),
    row(1200.0, true),
    row(1600.0, true),
    row(2000.0, true),
    row(2500.0, true),
    row(3000.0, true),
    row(4000.0, true),
    row(5000.0, true),
    row(6000.0, true),
];
