//! Thin wrappers around what the browser offers: its store, files, clock, print, focus, and the notice after a panic.
//!
//! Here: plain texts and numbers in and out. Not here: sheets, sentences, components, and no way to send anything
//! anywhere. Start with [`store`].

pub mod clock;
pub mod dom;
pub mod files;
pub mod page;
pub mod panic;
pub mod store;

use wasm_bindgen::JsCast;
use wasm_bindgen::closure::Closure;

/// Calls `act` for every `name` event which reaches the window, for as long as the page lives.
pub fn on_window(name: &str, act: impl FnMut(page::Event) + 'static) {
    let Some(window) = web_sys::window() else {
        return;
    };
    let listener = Closure::<dyn FnMut(page::Event)>::new(act);
    let added = window.add_event_listener_with_callback(name, listener.as_ref().unchecked_ref());
    if added.is_ok() {
        listener.forget();
    }
}

/// Calls `act` once what has been changed until now shows on the page, and before any other event is heard.
pub fn soon(act: impl FnOnce() + 'static) {
    // Changes are drawn by tasks which already wait in the same line.
    js_sys::futures::spawn_local(async move { act() });
}

/// Calls `act` once, just before the browser paints next.
pub fn on_next_frame(act: impl FnOnce() + 'static) {
    if let Some(window) = web_sys::window() {
        let asked = Closure::once_into_js(act);
        // Where no frame can be asked for, nothing is painted either.
        let _ = window.request_animation_frame(asked.unchecked_ref());
    }
}
