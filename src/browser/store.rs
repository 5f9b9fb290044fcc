//! Texts kept by the browser under keys. Several programs may share one store, so it is never emptied.

use wasm_bindgen::JsCast;
use web_sys::{Storage, StorageEvent};

/// Why a text was not kept.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum NotKept {
    /// The browser gives this page no store.
    Missing,
    /// The store is full, or refuses for now.
    Full,
}

/// The text under `key`.
pub fn read(key: &str) -> Option<String> {
    storage()?.get_item(key).ok().flatten()
}

/// Keeps `text` under `key`. The text there before stays if this one cannot be kept.
pub fn write(key: &str, text: &str) -> Result<(), NotKept> {
    storage()
        .ok_or(NotKept::Missing)?
        .set_item(key, text)
        .map_err(|_| NotKept::Full)
}

/// Drops the text under `key`.
pub fn remove(key: &str) {
    if let Some(storage) = storage() {
        // Fails only where the store cannot be written at all; then there is nothing to drop.
        let _ = storage.remove_item(key);
    }
}

/// The keys which begin with `beginning`, in order.
pub fn keys(beginning: &str) -> Vec<String> {
    let Some(storage) = storage() else {
        return Vec::new();
    };
    let mut keys: Vec<String> = (0..storage.length().unwrap_or(0))
        .filter_map(|position| storage.key(position).ok().flatten())
        .filter(|key| key.starts_with(beginning))
        .collect();
    keys.sort();
    keys
}

/// Calls `act` with the new text whenever another tab changes what is under `key`.
pub fn on_change_elsewhere(key: &'static str, mut act: impl FnMut(Option<String>) + 'static) {
    super::on_window("storage", move |event| {
        if let Some(event) = event.dyn_ref::<StorageEvent>()
            && event.key().as_deref() == Some(key)
        {
            act(event.new_value());
        }
    });
}

fn storage() -> Option<Storage> {
    web_sys::window()?.local_storage().ok().flatten()
}
