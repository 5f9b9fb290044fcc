//! The cautions: fixed safety statements which are always shown and always printed.

use crate::working::Caution;

/// A caution in words.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct CautionWords {
    /// Its heading.
    pub heading: &'static str,
    /// Its text.
    pub text: &'static str,
}

/// The words of a caution.
pub const fn caution(caution: Caution) -> CautionWords {
    match caution {
        Caution::LocalCodeDecides => CautionWords {
            heading: "The local code decides",
            text: "These are planning figures. The electrical code adopted where the panel is built and used, as its authority reads it, stands above them. A licensed engineer must review this sheet before anything is built or energised.",
        },
        Caution::StoredCharge => CautionWords {
            heading: "Drive capacitors stay charged",
            text: "The capacitors in a drive hold a dangerous voltage after it is isolated. Isolate and lock off, wait as long as the drive's instructions say, and prove it dead before touching anything.",
        },
        Caution::InstructionsGovern => CautionWords {
            heading: "The makers' instructions govern",
            text: "Where the instructions of a drive, a motor, a device or an enclosure ask for more than this sheet, or permit less, they hold. Read them for the very model and frame that is installed.",
        },
        Caution::FaultAndArcFlash => CautionWords {
            heading: "Fault current and arc flash need their own study",
            text: "The fault current here comes from a short method and from the values entered. Ratings must be checked against the utility's own figures. The danger at the open panel needs an arc-flash study; nothing here says what protective equipment to wear.",
        },
        Caution::ConfirmAssumptions => CautionWords {
            heading: "Confirm what is assumed",
            text: "Values marked assumed, and table cells known only from memory, stand in until somebody confirms them. Enter the real ones, or compare them with your own copy, before this sheet is relied upon.",
        },
    }
}

/// All cautions in one line, for the shrunken form.
pub const fn caution_line() -> &'static str {
    "Planning figures: the local code and a licensed review decide. Drive capacitors stay charged after isolation: wait, and prove dead."
}
