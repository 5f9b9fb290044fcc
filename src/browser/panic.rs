//! What happens when the program stops on a fault of its own: the page's notice is shown, and nothing else is touched.

use super::{page, store};

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
pub fn watch(rescue: Rescue) {
    std::panic::set_hook(Box::new(move |fault| {
        let stops = stops(rescue.counted_under).saturating_add(1);
        // A store which does not take the count only means that the next start does not know of this stop.
        let _ = store::write(rescue.counted_under, &stops.to_string());
        page::set_attribute("broken-save", "data-key", rescue.kept_under);
        page::set_attribute("broken-save", "data-name", rescue.file_name);
        if let Some(message) = page::element("broken-message") {
            message.set_text_content(Some(&fault.to_string()));
        }
        if let Some(notice) = page::element("broken-notice") {
            notice.set_hidden(false);
        }
    }));
}

/// How often in a row the program has stopped on a panic.
pub fn stops(counted_under: &str) -> u32 {
    store::read(counted_under)
        .and_then(|text| text.parse().ok())
        .unwrap_or(0)
}
