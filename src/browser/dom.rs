//! Elements of the page as they are made and changed: attributes, what a control holds, listeners.

use super::page::Event;
use js_sys::Reflect;
use wasm_bindgen::closure::Closure;
use wasm_bindgen::{JsCast, JsValue};
pub use web_sys::{Element, Node};

/// A new element; `None` where the browser has no page.
pub fn element(tag: &str) -> Option<Element> {
    web_sys::window()?.document()?.create_element(tag).ok()
}

/// Sets an attribute, or takes it away.
pub fn set_attribute(element: &Element, name: &str, value: Option<&str>) {
    // Fails only for names which are none.
    let _ = match value {
        Some(value) => element.set_attribute(name, value),
        None => element.remove_attribute(name),
    };
}

/// Sets a text which a control holds.
pub fn set_text(element: &Element, name: &str, text: &str) {
    set_property(element, name, &text.into());
}

/// Sets a claim which a control makes.
pub fn set_claim(element: &Element, name: &str, is_so: bool) {
    set_property(element, name, &is_so.into());
}

fn set_property(element: &Element, name: &str, value: &JsValue) {
    // Fails only for objects which are frozen.
    let _ = Reflect::set(element, &name.into(), value);
}

/// Puts a node into an element, before another one or at the end.
pub fn insert(parent: &Element, node: &Node, before: Option<&Node>) {
    // Fails only where `before` is in another element.
    let _ = parent.insert_before(node, before);
}

/// Hears an event of an element, until it is dropped.
pub struct Listener {
    element: Element,
    name: &'static str,
    heard: Closure<dyn FnMut(Event)>,
}

impl Listener {
    /// Calls `act` at each event of this name.
    pub fn new(element: &Element, name: &'static str, act: Box<dyn FnMut(Event)>) -> Self {
        let heard = Closure::wrap(act);
        // Fails only for listeners which are none.
        let _ = element.add_event_listener_with_callback(name, heard.as_ref().unchecked_ref());
        Self {
            element: element.clone(),
            name,
            heard,
        }
    }
}

impl Drop for Listener {
    fn drop(&mut self) {
        let heard = self.heard.as_ref().unchecked_ref();
        // Fails only for listeners which are none.
        let _ = self
            .element
            .remove_event_listener_with_callback(self.name, heard);
    }
}
