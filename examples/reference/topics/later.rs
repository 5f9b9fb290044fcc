//! Topics whose rows are kept until the core works them.

use super::{Topic, Work};

const fn later(name: &'static str, about: &'static str) -> Topic {
    Topic {
        name,
        about,
        inputs: &[],
        expected: &[],
        work: Work::Later,
    }
}

/// Topics to be taken up later.
pub const TOPICS: &[Topic] = &[
    later(
        "motor overload",
        "overload protection by the nameplate current",
    ),
    later(
        "transformer protection",
        "device of a transformer's secondary",
    ),
    later(
        "wound-rotor motor",
        "branch and feeder devices of wound-rotor motors",
    ),
    later("feeder in Canada", "feeder device by the Canadian code"),
    later(
        "drives by the older reading",
        "125 per cent of every drive, edition 2017",
    ),
    later(
        "motors in a fault",
        "what running motors add to a fault current",
    ),
    later(
        "single-phase voltage drop",
        "drop of a run of two wires, by the constant K",
    ),
    later(
        "single-phase fault current",
        "fault currents between the lines of a single-phase transformer",
    ),
    later(
        "imperial wall rule",
        "rise of a sealed box by the rule in square feet and Fahrenheit",
    ),
    later(
        "wall chart",
        "rise of a sealed box by a chart of watts for a square foot",
    ),
    later(
        "thermal resistance",
        "thermal resistance which an enclosure may have",
    ),
    later(
        "heat by resistance",
        "heat of the poles of a device of known resistance",
    ),
    later("cabinet width", "width of a cabinet from its free surface"),
    later(
        "surface sun heat",
        "heat of the sun by the surface it falls on",
    ),
    later(
        "fan and altitude",
        "pressure and power of a fan in thin air",
    ),
    later(
        "fans in parallel",
        "flow of two fans against one resistance",
    ),
    later(
        "fan and filter",
        "crossing of a fan's curve with a filter's resistance",
    ),
    later("duct pressure", "pressure which a duct takes"),
    later(
        "natural ventilation",
        "flow through two openings by the lightness of warm air",
    ),
    later("humid air", "density of humid air"),
    later(
        "dew point",
        "temperature and humidity at which surfaces sweat",
    ),
    later(
        "drive derating",
        "current of a drive in hot or thin air, or at fast switching",
    ),
    later("capacitor life", "life by the rule of ten degrees"),
    later("natural convection", "films of warm surfaces in still air"),
    later("radiation", "radiation of grey surfaces"),
    later("outer film", "convection and radiation of a wall together"),
    later("sealed balance", "sealed box from first principles"),
    later("cooled balance", "heat which a cooled sealed box takes up"),
    later(
        "bridge rectifier",
        "voltages and currents of the six-pulse bridge",
    ),
    later(
        "constant volts for hertz",
        "output voltage of a drive below its base frequency",
    ),
];
