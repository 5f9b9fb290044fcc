//! What happens when the program stops on a fault of its own: the page's notice is shown, and nothing else is touched.

use super::{page, store};

/// The id of the notice's button which saves.
const SAVE: &str = "broken-save";

/// What the notice offers.
#[derive(Debug, Clone, Copy)]
pub struct Rescue {
    /// Key under which the open sheet is kept.
    pub kept_under: &'static str,
    /// File name under which it is offered.
    pub file_name: &'static str,
    /// Key under which the program counts how often it stopped.
    pub counted_under: &'static str,
}

/// From now on a panic shows the page's notice with its message, and offers what `rescue` names.
///
/// What the notice needs is written into it now: a trap, as when stack or memory run out, never asks the hook.
pub fn watch(rescue: Rescue) {
    offer(rescue.kept_under);
    page::set_attribute(SAVE, "data-name", rescue.file_name);
    page::set_attribute(SAVE, "data-stops", rescue.counted_under);
    std::panic::set_hook(Box::new(move |fault| {
        let stops = stops(rescue.counted_under).saturating_add(1);
        // A store which does not take the count only means that the next start does not know of this stop.
        let _ = store::write(rescue.counted_under, &stops.to_string());
        if let Some(message) = page::element("broken-message") {
            message.set_text_content(Some(&fault.to_string()));
        }
        if let Some(notice) = page::element("broken-notice") {
            notice.set_hidden(false);
        }
    }));
}

/// From now on the notice offers what is kept under `key`.
pub fn offer(key: &str) {
    page::set_attribute(SAVE, "data-key", key);
}

/// How often in a row the program has stopped on a fault of its own.
pub fn stops(counted_under: &str) -> u32 {
    store::read(counted_under)
        .and_then(|text| text.parse().ok())
        .unwrap_or(0)
}
