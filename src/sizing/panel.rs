//! The incoming circuit: running and connected current, incoming conductors, main device.

use crate::quantity::Current;
use crate::sizing::conductor::Conductors;
use crate::tables::DeviceType;
use crate::working::{Figure, Given};
use std::sync::Arc;

/// The main device, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct MainDevice {
    /// Its type.
    pub device: Given<DeviceType>,
    /// Largest branch device and the motor currents of the others.
    pub sum: Arc<Figure>,
    /// The same sum with the drives' input currents for the others, for comparison.
    pub sum_by_inputs: Arc<Figure>,
    /// Largest standard rating not above the sum.
    pub largest: Option<Arc<Figure>>,
    /// The installed rating: as entered, or the largest.
    pub rating: Option<Given<Current>>,
}

/// The incoming circuit of the panel, worked.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct IncomingCircuit {
    /// Input currents of what runs together.
    pub running: Option<Arc<Figure>>,
    /// Input currents of everything connected.
    pub connected: Option<Arc<Figure>>,
    /// Ampacity for what is connected, beside the one the conductors are sized for.
    pub required_connected: Option<Arc<Figure>>,
    /// Incoming conductors, for what runs together.
    pub conductors: Option<Conductors>,
    /// Main device.
    pub main: Option<MainDevice>,
}
