//! The worked sheet: plain data, for the page, the printed summary and the exported files.

use crate::assume::Assumption;
use crate::quantity::{Current, Power, Temperature};
use crate::sizing::air::Air;
use crate::sizing::conductor::Conductors;
use crate::sizing::device::Device;
use crate::sizing::fault::Fault;
use crate::sizing::heat::FeederHeat;
use crate::sizing::panel::IncomingCircuit;
use crate::sizing::reactor::Reactor;
use crate::working::{Amount, Figure, Given, Holder, HolderId, MarginNote};
use std::sync::Arc;

/// A feeder, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct WorkedFeeder {
    /// Which feeder.
    pub id: HolderId,
    /// Its tag, empty where none was entered.
    pub tag: String,
    /// What it drives.
    pub load: String,
    /// Whether it runs together with the others.
    pub is_running: bool,
    /// Motor full-load current.
    pub motor_current: Option<Given<Current>>,
    /// The drive's rated input current.
    pub drive_input: Option<Given<Current>>,
    /// Conductors ahead of the drive.
    pub ahead: Option<Conductors>,
    /// Conductors behind the drive.
    pub behind: Option<Conductors>,
    /// Voltage drop of both runs as a share of the supply voltage.
    pub drop_ratio: Option<Arc<Figure>>,
    /// Branch device.
    pub device: Option<Device>,
    /// Smallest rating of the disconnect.
    pub disconnect: Option<Arc<Figure>>,
    /// Input reactor.
    pub reactor: Reactor,
    /// Heat.
    pub heat: FeederHeat,
    /// Short-circuit current rating of the drive with its device, where entered.
    pub short_circuit_rating: Option<Given<Current>>,
    /// What was assumed.
    pub assumptions: Vec<Assumption>,
    /// What was found, gravest first.
    pub notes: Vec<MarginNote>,
}

/// Another source of heat, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct WorkedSource {
    /// Which source.
    pub id: HolderId,
    /// What it is.
    pub name: String,
    /// Whether it runs together with the feeders.
    pub is_running: bool,
    /// Its heat.
    pub heat: Option<Given<Power>>,
    /// Current it takes from the supply.
    pub current: Option<Given<Current>>,
}

/// The groups of the heat ledger.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum LedgerGroup {
    /// Drives, the part inside.
    Drives,
    /// Input reactors.
    Reactors,
    /// Branch devices and the main device.
    Devices,
    /// Conductors inside.
    Conductors,
    /// Control supplies and other sources.
    Others,
    /// Heat of the sun.
    Sun,
}

/// A group of the ledger with its sums.
#[derive(Debug, Clone, PartialEq)]
pub struct LedgerRow {
    /// The group.
    pub group: LedgerGroup,
    /// How many sources it has.
    pub sources: u32,
    /// Heat of what runs together.
    pub running: Arc<Figure>,
    /// Heat of everything connected.
    pub connected: Arc<Figure>,
}

/// Every source of heat in the enclosure.
#[derive(Debug, Clone, PartialEq)]
pub struct Ledger {
    /// The groups which have sources.
    pub rows: Vec<LedgerRow>,
    /// Sum of what runs together.
    pub running: Arc<Figure>,
    /// Sum of everything connected.
    pub connected: Arc<Figure>,
    /// Advised reactors which are not entered: beside the total.
    pub advised_reactors: Option<Arc<Figure>>,
}

/// The enclosure, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct WorkedEnclosure {
    /// Whether fans blow air through it.
    pub is_ventilated: bool,
    /// Highest temperature of the air around it.
    pub ambient: Given<Temperature>,
    /// Highest temperature allowed inside.
    pub limit: Given<Temperature>,
    /// Walls and air for the heat of what runs together.
    pub air: Air,
    /// Walls and air for the heat of everything connected.
    pub air_connected: Air,
}

/// A verdict on a total.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Verdict {
    /// Within its limit.
    Within,
    /// Beyond it.
    Beyond,
    /// It cannot be said yet.
    Unknown,
    /// There is no limit.
    NoLimit,
}

/// The totals which stand at the head of the margin.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum TotalKind {
    /// Heat inside.
    Heat,
    /// Air inside against its limit.
    InsideTemperature,
    /// Air to be moved against what the fans move.
    Airflow,
    /// Incoming current against what the incoming conductors carry.
    IncomingCurrent,
    /// Main device against the largest permitted.
    MainDevice,
    /// Fault current against the lowest rating inside.
    FaultCurrent,
}

/// One total with its limit.
#[derive(Debug, Clone, PartialEq)]
pub struct Total {
    /// Which.
    pub kind: TotalKind,
    /// Its value for what runs together.
    pub running: Option<Amount>,
    /// Its value for everything connected, where that differs in kind.
    pub connected: Option<Amount>,
    /// The figure behind the value.
    pub figure: Option<Arc<Figure>>,
    /// The limit.
    pub limit: Option<Amount>,
    /// The verdict on the running value.
    pub verdict: Verdict,
}

/// A worked sheet.
#[derive(Debug, Clone, PartialEq)]
pub struct Worked {
    /// The feeders in their order.
    pub feeders: Vec<Arc<WorkedFeeder>>,
    /// Other sources of heat.
    pub sources: Vec<WorkedSource>,
    /// Incoming circuit.
    pub incoming: IncomingCircuit,
    /// Fault current at the panel.
    pub fault: Fault,
    /// Lowest entered short-circuit rating, and what has it.
    pub lowest_rating: Option<(Current, Vec<Holder>)>,
    /// Heat ledger.
    pub ledger: Ledger,
    /// Enclosure.
    pub enclosure: WorkedEnclosure,
    /// Totals for the head of the margin.
    pub totals: Vec<Total>,
    /// Everything assumed, of the sheet and of its items.
    pub assumptions: Vec<Assumption>,
    /// Everything found, stops first.
    pub notes: Vec<MarginNote>,
    /// What the next working may take over; equal for all.
    pub(super) memory: super::sheet::Memory,
}
