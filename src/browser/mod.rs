//! Thin wrappers around what the browser offers: its store, files, clock, print, focus, and the notice after a panic.
//!
//! Here: plain texts and numbers in and out. Not here: sheets, sentences, components, and no way to send anything
//! anywhere. Start with [`store`].

pub mod clock;
pub mod files;
pub mod page;
pub mod panic;
pub mod store;

use wasm_bindgen::JsCast;
use wasm_bindgen::closure::Closure;

/// Calls `act` for every `name` event which reaches the window, for as long as the page lives.
pub fn on_window<E: JsCast + 'static>(name: &str, mut act: impl FnMut(E) + 'static) {
    let Some(window) = web_sys::window() else {
        return;
    };
    let listener = Closure::<dyn FnMut(web_sys::Event)>::new(move |event: web_sys::Event| {
        if let Ok(event) = event.dyn_into() {
            act(event);
        }
    });
    let added = window.add_event_listener_with_callback(name, listener.as_ref().unchecked_ref());
    if added.is_ok() {
        listener.forget();
    }
}

/// Calls `act` once, just before the browser paints next.
pub fn on_next_frame(act: impl FnOnce() + 'static) {
    if let Some(window) = web_sys::window() {
        let asked = Closure::once_into_js(act);
        // Where no frame can be asked for, nothing is painted either.
        let _ = window.request_animation_frame(asked.unchecked_ref());
    }
}
