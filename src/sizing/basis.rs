//! The basis by which a sheet is worked, and its edition: the one value which every rule that differs takes.

use crate::tables::Edition;

/// A rule family with its edition.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Basis {
    /// NFPA 70 with UL 508A.
    Nec(Edition),
}

impl Basis {
    /// The edition of the NEC whose rules and tables are worked.
    pub const fn edition(self) -> Edition {
        match self {
            Basis::Nec(edition) => edition,
        }
    }
}
