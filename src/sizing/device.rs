//! The branch protective device ahead of a drive.

use crate::quantity::Current;
use crate::tables::DeviceType;
use crate::working::{Figure, Given};
use std::collections::BTreeSet;
use std::sync::Arc;

/// What a branch device is sized from.
#[derive(Debug, Clone, PartialEq)]
pub struct DeviceInput {
    /// Type of the device.
    pub device: Given<DeviceType>,
    /// Motor full-load current.
    pub motor_current: Given<Current>,
    /// The drive's rated input current.
    pub drive_input: Option<Given<Current>>,
    /// Types which the drive's instructions permit, where entered.
    pub permitted: Option<BTreeSet<DeviceType>>,
    /// Largest rating which the drive's instructions permit, where entered.
    pub largest: Option<Given<Current>>,
    /// Rating to be installed, where entered.
    pub rating: Option<Given<Current>>,
}

/// A branch device, worked.
#[derive(Debug, Clone, PartialEq)]
pub struct Device {
    /// Its type.
    pub device: Given<DeviceType>,
    /// Percentage of the table times motor current.
    pub product: Arc<Figure>,
    /// The largest rating which rule and drive permit; `None` where no rating is right.
    pub largest: Option<Arc<Figure>>,
    /// The installed rating: as entered, or the largest permitted.
    pub rating: Option<Given<Current>>,
}
