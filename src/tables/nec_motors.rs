//! NEC 2023, Table 430.250: full-load currents of three-phase motors, and Table 430.52(C)(1): largest branch devices.

use super::{DeviceType, Known};
use crate::math::reaches;
use crate::quantity::{Current, Ratio, ShaftPower, Voltage};

/// The motor voltages of Table 430.250 which low-voltage supplies serve.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum MotorVoltage {
    /// 115 V motors, supplies of 110 to 120 V.
    V115,
    /// 200 V motors.
    V200,
    /// 208 V motors.
    V208,
    /// 230 V motors, supplies of 220 to 240 V.
    V230,
    /// 460 V motors, supplies of 440 to 480 V.
    V460,
    /// 575 V motors, supplies of 550 to 600 V.
    V575,
}

impl MotorVoltage {
    /// Every column, lowest first.
    pub const ALL: [MotorVoltage; 6] = [
        MotorVoltage::V115,
        MotorVoltage::V200,
        MotorVoltage::V208,
        MotorVoltage::V230,
        MotorVoltage::V460,
        MotorVoltage::V575,
    ];

    /// The voltage in the head of the column.
    pub const fn voltage(self) -> Voltage {
        Voltage::volts(match self {
            MotorVoltage::V115 => 115.0,
            MotorVoltage::V200 => 200.0,
            MotorVoltage::V208 => 208.0,
            MotorVoltage::V230 => 230.0,
            MotorVoltage::V460 => 460.0,
            MotorVoltage::V575 => 575.0,
        })
    }

    /// The column whose currents serve a supply of `voltage`; `None` between the voltages which the table serves.
    ///
    /// Source: NEC 2023, Table 430.250, heading: the currents are permitted for systems of 110 to 120, 220 to 240,
    /// 440 to 480 and 550 to 600 V; 200 and 208 V serve themselves. They are never scaled by voltage.
    pub fn serving(voltage: Voltage) -> Option<Self> {
        let volts = voltage.to_volts();
        let within = |least: f64, most: f64| reaches(volts, least) && reaches(most, volts);
        Self::ALL.into_iter().find(|column| match column {
            MotorVoltage::V115 => within(110.0, 120.0),
            MotorVoltage::V200 => within(200.0, 200.0),
            MotorVoltage::V208 => within(208.0, 208.0),
            MotorVoltage::V230 => within(220.0, 240.0),
            MotorVoltage::V460 => within(440.0, 480.0),
            MotorVoltage::V575 => within(550.0, 600.0),
        })
    }
}

/// A row of Table 430.250.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct MotorRow {
    /// Rated power.
    pub power: ShaftPower,
    amperes: [Option<f64>; 6],
}

impl MotorRow {
    /// The current in the column of `voltage`; `None` where the table has no such motor.
    pub fn current(&self, voltage: MotorVoltage) -> Option<Current> {
        MotorVoltage::ALL
            .iter()
            .zip(self.amperes)
            .find(|(column, _)| **column == voltage)
            .and_then(|(_, amperes)| amperes)
            .map(Current::amperes)
    }
}

/// The row at or above `power` which has a current at `voltage`, and whether it is the motor's very row.
///
/// A power between two rows takes the next row up, which is the cautious of the two usual readings.
pub fn motor_row(power: ShaftPower, voltage: MotorVoltage) -> Option<(MotorRow, bool)> {
    let row = MOTOR_ROWS
        .iter()
        .find(|row| reaches(row.power.to_watts(), power.to_watts()))?;
    row.current(voltage)?;
    let is_exact = reaches(power.to_watts(), row.power.to_watts());
    Some((*row, is_exact))
}

const fn row(horsepower: f64, amperes: [Option<f64>; 6]) -> MotorRow {
    MotorRow {
        power: ShaftPower::horsepower(horsepower),
        amperes,
    }
}

/// How the cells of Table 430.250 are known.
pub const MOTOR_ROWS_KNOWN: Known = Known::CrossChecked;

/// Table 430.250, induction motors, squirrel cage and wound rotor; columns 115, 200, 208, 230, 460, 575 V, amperes.
#[rustfmt::skip]
pub static MOTOR_ROWS: [MotorRow; 27] = [
    row(0.5, [Some(4.4), Some(2.5), Some(2.4), Some(2.2), Some(1.1), Some(0.9)]),
    row(0.75, [Some(6.4), Some(3.7), Some(3.5), Some(3.2), Some(1.6), Some(1.3)]),
    row(1.0, [Some(8.4), Some(4.8), Some(4.6), Some(4.2), Some(2.1), Some(1.7)]),
    row(1.5, [Some(12.0), Some(6.9), Some(6.6), Some(6.0), Some(3.0), Some(2.4)]),
    row(2.0, [Some(13.6), Some(7.8), Some(7.5), Some(6.8), Some(3.4), Some(2.7)]),
    row(3.0, [None, Some(11.0), Some(10.6), Some(9.6), Some(4.8), Some(3.9)]),
    row(5.0, [None, Some(17.5), Some(16.7), Some(15.2), Some(7.6), Some(6.1)]),
    row(7.5, [None, Some(25.3), Some(24.2), Some(22.0), Some(11.0), Some(9.0)]),
    row(10.0, [None, Some(32.2), Some(30.8), Some(28.0), Some(14.0), Some(11.0)]),
    row(15.0, [None, Some(48.3), Some(46.2), Some(42.0), Some(21.0), Some(17.0)]),
    row(20.0, [None, Some(62.1), Some(59.4), Some(54.0), Some(27.0), Some(22.0)]),
    row(25.0, [None, Some(78.2), Some(74.8), Some(68.0), Some(34.0), Some(27.0)]),
    row(30.0, [None, Some(92.0), Some(88.0), Some(80.0), Some(40.0), Some(32.0)]),
    row(40.0, [None, Some(120.0), Some(114.0), Some(104.0), Some(52.0), Some(41.0)]),
    row(50.0, [None, Some(150.0), Some(143.0), Some(130.0), Some(65.0), Some(52.0)]),
    row(60.0, [None, Some(177.0), Some(169.0), Some(154.0), Some(77.0), Some(62.0)]),
    row(75.0, [None, Some(221.0), Some(211.0), Some(192.0), Some(96.0), Some(77.0)]),
    row(100.0, [None, Some(285.0), Some(273.0), Some(248.0), Some(124.0), Some(99.0)]),
    row(125.0, [None, Some(359.0), Some(343.0), Some(312.0), Some(156.0), Some(125.0)]),
    row(150.0, [None, Some(414.0), Some(396.0), Some(360.0), Some(180.0), Some(144.0)]),
    row(200.0, [None, Some(552.0), Some(528.0), Some(480.0), Some(240.0), Some(192.0)]),
    row(250.0, [None, None, None, None, Some(302.0), Some(242.0)]),
    row(300.0, [None, None, None, None, Some(361.0), Some(289.0)]),
    row(350.0, [None, None, None, None, Some(414.0), Some(336.0)]),
    row(400.0, [None, None, None, None, Some(477.0), Some(382.0)]),
    row(450.0, [None, None, None, None, Some(515.0), Some(412.0)]),
    row(500.0, [None, None, None, None, Some(590.0), Some(472.0)]),
];

/// Table 430.52(C)(1), polyphase motors other than wound-rotor: the device at most, for its type, as a ratio of the
/// motor full-load current. Class CC time-delay fuses use the nontime-delay column (note to the table).
pub fn largest_ratio(device: DeviceType) -> Ratio {
    Ratio::per_cent(match device {
        DeviceType::NontimeDelayFuse | DeviceType::ClassCcFuse => 300.0,
        DeviceType::TimeDelayFuse => 175.0,
        DeviceType::InverseTimeBreaker => 250.0,
    })
}
