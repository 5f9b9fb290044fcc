//! Places of a sheet: which field of which holder. A term or a margin note points to one.

/// Names a feeder or a heat source for as long as the sheet lives; never used twice.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct HolderId(pub u32);

/// What holds a field: the sheet itself, one of its feeders, or one of its other heat sources.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Holder {
    /// The sheet: title, supply, incoming circuit, enclosure.
    Sheet,
    /// A feeder.
    Feeder(HolderId),
    /// Another source of heat.
    Source(HolderId),
}

/// A field of a holder.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct Place {
    /// The holder.
    pub holder: Holder,
    /// The field.
    pub field: Field,
}

/// A length of conductors.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Run {
    /// From the supply to the panel.
    Incoming,
    /// From the protective device to the drive.
    Ahead,
    /// From the drive to the motor.
    Behind,
}

/// What is entered of a run.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum RunField {
    /// Inside the enclosure or in the field.
    Place,
    /// Length one way.
    Length,
    /// Copper or aluminium.
    Metal,
    /// Number of conductors in parallel for each phase.
    Sets,
    /// The size to be installed, where it is not the smallest which fits.
    Size,
    /// Temperature of the air along the route.
    Ambient,
    /// Current-carrying conductors in the raceway.
    Carrying,
    /// Temperature rating of the insulation.
    Insulation,
    /// Temperature marked at the terminals.
    Terminal,
    /// What the raceway is made of.
    Conduit,
    /// Power factor of the current, for the voltage drop.
    PowerFactor,
}

macro_rules! fields {
    ($($(#[$doc:meta])* $name:ident),+ $(,)?) => {
        /// A field in which something can be entered.
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub enum Field {
            $($(#[$doc])* $name,)+
            /// A field of a run.
            Run(Run, RunField),
        }
        impl Field {
            /// Every field but those of the runs.
            pub const PLAIN: &'static [Field] = &[$(Field::$name),+];
        }
    };
}

fields! {
    // Title block.
    /// What the sheet is called.
    SheetName,
    /// Job number.
    Job,
    /// Issue of the sheet.
    Issue,
    /// Who prepared it.
    PreparedBy,
    /// Date of the issue, as written.
    IssueDate,
    /// A remark which prints: a local amendment, an edition unknown here.
    Remark,
    /// The rule family.
    Basis,
    /// Its edition.
    Edition,
    /// Units in which values are shown.
    Units,
    // Supply and site.
    /// Voltage between lines of the supply.
    SupplyVoltage,
    /// Frequency of the supply.
    SupplyFrequency,
    /// Fault current at the start of the incoming run, where known without the transformer.
    SourceFaultCurrent,
    /// Rated power of the supply transformer.
    TransformerPower,
    /// Impedance of the supply transformer.
    TransformerImpedance,
    /// Whether the impedance is from the nameplate or measured.
    ImpedanceKind,
    /// Voltage unbalance at the panel.
    VoltageUnbalance,
    /// Whether power-factor capacitors are switched on the bus.
    Capacitors,
    /// Whether the supply is prone to surges.
    Surges,
    /// Height above sea level.
    Altitude,
    /// Highest temperature of the air around the enclosure.
    RoomAmbient,
    // Main device.
    /// Type of the main device.
    MainType,
    /// Rating of the main device, where not the largest permitted.
    MainRating,
    /// Short-circuit current rating of the main device.
    MainShortCircuitRating,
    /// Loss of the main device at the running current.
    MainLoss,
    // Enclosure.
    /// Height outside.
    EnclosureHeight,
    /// Width outside.
    EnclosureWidth,
    /// Depth outside.
    EnclosureDepth,
    /// What the walls are made of.
    EnclosureMaterial,
    /// Wall coefficient, where not by material.
    WallCoefficient,
    /// How the enclosure stands.
    Mounting,
    /// Indoors or outdoors.
    Surroundings,
    /// Heat of the sun taken up by the enclosure.
    SunHeat,
    /// How heat leaves.
    Cooling,
    /// Highest temperature allowed of the air inside.
    InsideLimit,
    /// Airflow which the installed fans move against their filters.
    InstalledAirflow,
    // Feeder.
    /// Tag of the feeder.
    Tag,
    /// What is driven.
    Load,
    /// Runs together with the others, or stands by.
    Running,
    /// Rated power of the motor.
    MotorPower,
    /// Motor full-load current, where not by table.
    MotorCurrent,
    /// Rated input current of the drive.
    DriveInput,
    /// Loss of the drive at full load, by its data sheet.
    DriveLoss,
    /// Share of the loss which a heatsink through the wall carries outside.
    HeatsinkShare,
    /// Choke built into the drive.
    DriveChoke,
    /// Highest ambient at which the drive gives its full current.
    DriveAmbientLimit,
    /// Highest altitude at which the drive gives its full current.
    DriveAltitudeLimit,
    /// Device types which the drive's instructions permit.
    PermittedTypes,
    /// Largest device rating which the drive's instructions permit.
    LargestPermitted,
    /// Short-circuit current rating of the drive with its device.
    ShortCircuitRating,
    /// Type of the branch device.
    DeviceType,
    /// Rating of the branch device, where not the one worked out.
    DeviceRating,
    /// Loss of the branch device at the drive's input current.
    DeviceLoss,
    /// Input reactor, as a percentage.
    ReactorPercent,
    /// The current to which the percentage refers.
    ReactorReference,
    /// That current, where entered.
    ReactorReferenceCurrent,
    /// Loss of the reactor.
    ReactorLoss,
    /// A remark on the feeder.
    FeederRemark,
    // Another source of heat.
    /// What it is.
    SourceName,
    /// Its heat.
    SourceHeat,
    /// Output of a control supply, from which its heat follows.
    SourceOutput,
    /// Efficiency of that supply.
    SourceEfficiency,
    /// Current it takes from the supply.
    SourceCurrent,
    /// Runs together with the feeders, or stands by.
    SourceRunning,
}
