//! The answers which a choice field offers.

macro_rules! choices {
    ($($(#[$doc:meta])* $name:ident),+ $(,)?) => {
        /// One answer of a field which offers a choice.
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum Choice {
            $($(#[$doc])* $name,)+
        }
        impl Choice {
            /// Every choice.
            pub const ALL: &'static [Choice] = &[$(Choice::$name),+];
        }
    };
}

choices! {
    /// The basis `NEC`.
    Nec,
    /// Its edition of 2023.
    Nec2023,
    /// US customary units.
    UsCustomary,
    /// SI units.
    Si,
    /// Impedance from a nameplate.
    Nameplate,
    /// Impedance measured on the unit itself.
    MeasuredImpedance,
    /// Yes.
    Yes,
    /// No.
    No,
    /// Runs together with the others.
    Together,
    /// Stands by.
    Standby,
    /// Inside the enclosure.
    Inside,
    /// In the field.
    Field,
    /// Copper.
    Copper,
    /// Aluminium.
    Aluminium,
    /// Steel conduit.
    SteelConduit,
    /// PVC conduit.
    PvcConduit,
    /// Aluminium conduit.
    AluminiumConduit,
    /// Insulation for 60 °C.
    Insulation60,
    /// Insulation for 75 °C.
    Insulation75,
    /// Insulation for 90 °C.
    Insulation90,
    /// Terminals without a mark.
    Unmarked,
    /// Terminals marked 60 °C.
    Marked60,
    /// Terminals marked 75 °C.
    Marked75,
    /// Dual-element time-delay fuse.
    TimeDelayFuse,
    /// Nontime-delay fuse.
    NontimeDelayFuse,
    /// Class CC fuse.
    ClassCcFuse,
    /// Inverse time breaker.
    InverseTimeBreaker,
    /// Painted or coated sheet.
    Painted,
    /// Bare stainless steel or aluminium.
    BareMetal,
    /// Plastic.
    Plastic,
    /// Double-walled.
    DoubleWalled,
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
    /// Indoors.
    Indoors,
    /// Outdoors.
    Outdoors,
    /// Closed, heat leaves by the walls.
    Sealed,
    /// Fans with filters blow air through.
    FilterFans,
    /// Percentage refers to the drive's rated input current.
    OfDriveInput,
    /// Percentage refers to the motor's full-load current.
    OfMotorCurrent,
    /// Percentage refers to a current of its own.
    OfOwnCurrent,
}
