//! Enclosures: surface factors by how they stand, and wall coefficients by material.

use crate::quantity::{Ratio, Transmittance};

/// How an enclosure stands among walls and neighbours.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Mounting {
    /// Alone, free on all sides.
    Free,
    /// Alone, its rear against a wall.
    AgainstWall,
    /// First or last of a free-standing row.
    RowEnd,
    /// First or last of a row against a wall.
    WallRowEnd,
    /// Within a free-standing row.
    RowMiddle,
    /// Within a row against a wall.
    WallRowMiddle,
    /// Within a row against a wall, its top covered.
    WallRowMiddleCovered,
}

impl Mounting {
    /// Every arrangement.
    pub const ALL: [Mounting; 7] = [
        Mounting::Free,
        Mounting::AgainstWall,
        Mounting::RowEnd,
        Mounting::WallRowEnd,
        Mounting::RowMiddle,
        Mounting::WallRowMiddle,
        Mounting::WallRowMiddleCovered,
    ];

    /// The factor b of each face for this arrangement. The floor counts for nothing.
    ///
    /// Source: IEC TR 60890 / DIN VDE 0660-500, surface factors: exposed top 1.4, covered top 0.7, exposed vertical face
    /// 0.9, vertical face against a wall or a neighbour 0.5. The seven printed area formulas are exactly these sums.
    pub const fn factors(self) -> FaceFactors {
        let rear = match self {
            Mounting::Free | Mounting::RowEnd | Mounting::RowMiddle => EXPOSED_SIDE,
            Mounting::AgainstWall
            | Mounting::WallRowEnd
            | Mounting::WallRowMiddle
            | Mounting::WallRowMiddleCovered => COVERED_SIDE,
        };
        let (left, right) = match self {
            Mounting::Free | Mounting::AgainstWall => (EXPOSED_SIDE, EXPOSED_SIDE),
            Mounting::RowEnd | Mounting::WallRowEnd => (EXPOSED_SIDE, COVERED_SIDE),
            Mounting::RowMiddle | Mounting::WallRowMiddle | Mounting::WallRowMiddleCovered => {
                (COVERED_SIDE, COVERED_SIDE)
            }
        };
        let top = match self {
            Mounting::WallRowMiddleCovered => COVERED_TOP,
            _ => EXPOSED_TOP,
        };
        FaceFactors {
            top,
            front: EXPOSED_SIDE,
            rear,
            left,
            right,
        }
    }
}

/// The surface factor of each face which counts.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FaceFactors {
    /// Top.
    pub top: Ratio,
    /// Front.
    pub front: Ratio,
    /// Rear.
    pub rear: Ratio,
    /// Left side.
    pub left: Ratio,
    /// Right side.
    pub right: Ratio,
}

/// Surface factor of an exposed top.
pub const EXPOSED_TOP: Ratio = Ratio::of_one(1.4);
/// Surface factor of a covered top.
pub const COVERED_TOP: Ratio = Ratio::of_one(0.7);
/// Surface factor of an exposed vertical face.
pub const EXPOSED_SIDE: Ratio = Ratio::of_one(0.9);
/// Surface factor of a vertical face against a wall or a neighbour.
pub const COVERED_SIDE: Ratio = Ratio::of_one(0.5);

/// What the walls of an enclosure are made of, as far as heat cares.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum WallMaterial {
    /// Painted or coated sheet.
    Painted,
    /// Bare stainless steel or aluminium.
    BareMetal,
    /// Plastic.
    Plastic,
    /// Double-walled.
    DoubleWalled,
}

/// The coefficient k of the linear wall rule, on the effective surface.
///
/// Trade figures: 5.5 W/m2K for painted sheet steel in still air; bare metal 2.5 at most, since it hardly radiates (the
/// 12 W/m2K printed for aluminium is not used); plastic 3.5; double-walled 2.5.
pub const fn wall_coefficient(material: WallMaterial) -> Transmittance {
    Transmittance::watts_per_square_metre_kelvin(match material {
        WallMaterial::Painted => 5.5,
        WallMaterial::BareMetal | WallMaterial::DoubleWalled => 2.5,
        WallMaterial::Plastic => 3.5,
    })
}
