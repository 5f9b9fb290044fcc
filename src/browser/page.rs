//! The page itself: elements by id, focus, title, print.

use wasm_bindgen::JsCast;
use web_sys::{Document, Element, HtmlDialogElement, HtmlElement, HtmlInputElement, KeyboardEvent};
pub use web_sys::{Event, EventTarget};

/// A key which was pressed.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Key {
    /// The letter it gives, or its name.
    pub name: String,
    /// Whether Control (on some machines, Command) is held.
    pub control: bool,
    /// Whether Alt is held.
    pub alt: bool,
    /// Whether Shift is held.
    pub shift: bool,
    /// Whether it takes part in composing a letter.
    pub is_composing: bool,
}

/// The key of an event; `None` where the event is of another kind.
pub fn key(event: &Event) -> Option<Key> {
    let event: &KeyboardEvent = event.dyn_ref()?;
    Some(Key {
        name: event.key(),
        control: event.ctrl_key() || event.meta_key(),
        alt: event.alt_key(),
        shift: event.shift_key(),
        is_composing: event.is_composing(),
    })
}

/// The key is taken: neither the browser nor anything around hears it again.
pub fn take(event: &Event) {
    event.prevent_default();
    event.stop_propagation();
}

/// The element with this id.
pub fn element(id: &str) -> Option<HtmlElement> {
    document()?.get_element_by_id(id)?.dyn_into().ok()
}

/// Moves the focus to the element with this id; gives whether it is there.
pub fn focus(id: &str) -> bool {
    element(id).is_some_and(|element| element.focus().is_ok())
}

/// Moves the focus to the element with this id once the page has been brought up to date.
pub fn focus_soon(id: String) {
    super::soon(move || {
        focus(&id);
    });
}

/// As [`focus_soon`], and selects the text of an input.
pub fn focus_and_select_soon(id: &'static str) {
    super::soon(move || {
        if focus(id)
            && let Some(input) = element(id).and_then(|found| found.dyn_into().ok())
        {
            let input: HtmlInputElement = input;
            input.select();
        }
    });
}

/// Brings the element with this id into view once the page has been brought up to date.
pub fn show_soon(id: String) {
    super::soon(move || {
        if let Some(element) = element(&id) {
            element.scroll_into_view();
        }
    });
}

/// The id of the nearest element around the focus which `selector` describes.
pub fn focused_within(selector: &str) -> Option<String> {
    let around = document()?.active_element()?.closest(selector).ok()??;
    Some(around.id())
}

/// Has the input with the focus take what is typed in it, as if it were left.
pub fn finish_typing() {
    let focused = document().and_then(|document| document.active_element());
    let input: Option<HtmlElement> = focused
        .filter(|element| element.matches("input, textarea").unwrap_or(false))
        .and_then(|element| element.dyn_into().ok());
    if let Some(input) = input
        && input.blur().is_ok()
    {
        // Fails only for elements which cannot have the focus; this one had it.
        let _ = input.focus();
    }
}

/// Whether the window has the focus, and not another one.
pub fn has_focus() -> bool {
    document().is_some_and(|document| document.has_focus().unwrap_or(true))
}

/// Whether the person is typing or choosing somewhere, so that keys belong to that place.
pub fn is_entering() -> bool {
    focused_within("input, select, textarea").is_some()
}

/// The nearest element around the target of an event, itself included, which `selector` describes.
pub fn nearest(target: Option<EventTarget>, selector: &str) -> Option<HtmlElement> {
    let element: Element = target?.dyn_into().ok()?;
    element.closest(selector).ok()??.dyn_into().ok()
}

/// The text in the input or list which an event is about.
pub fn typed(target: Option<EventTarget>) -> Option<String> {
    let target = target?;
    if let Some(input) = target.dyn_ref::<HtmlInputElement>() {
        return Some(input.value());
    }
    if let Some(list) = target.dyn_ref::<web_sys::HtmlSelectElement>() {
        return Some(list.value());
    }
    let area = target.dyn_ref::<web_sys::HtmlTextAreaElement>()?;
    Some(area.value())
}

/// The text in the input or list with this id.
pub fn typed_in(id: &str) -> Option<String> {
    typed(element(id).map(Into::into))
}

/// Puts a text into the input which an event is about.
pub fn set_typed(target: Option<EventTarget>, text: &str) {
    let Some(target) = target else {
        return;
    };
    if let Some(input) = target.dyn_ref::<HtmlInputElement>() {
        input.set_value(text);
    } else if let Some(area) = target.dyn_ref::<web_sys::HtmlTextAreaElement>() {
        area.set_value(text);
    }
}

/// Sets an attribute of the element with this id, if it is there.
pub fn set_attribute(id: &str, name: &str, value: &str) {
    if let Some(element) = element(id) {
        // Fails only for names which are none.
        let _ = element.set_attribute(name, value);
    }
}

/// Whether the part which an event is about is folded open.
pub fn is_open(target: Option<EventTarget>) -> bool {
    nearest(target, "details").is_some_and(|part| part.has_attribute("open"))
}

/// Opens the dialog with this id over the page.
pub fn open_dialog(id: &str) {
    if let Some(dialog) = dialog(id) {
        // Refused only where it is open already.
        let _ = dialog.show_modal();
    }
}

/// Closes the dialog with this id; the focus goes back to where it was.
pub fn close_dialog(id: &str) {
    if let Some(dialog) = dialog(id) {
        dialog.close();
    }
}

fn dialog(id: &str) -> Option<HtmlDialogElement> {
    element(id)?.dyn_into().ok()
}

/// Names the page; a browser offers this name for a printed file.
pub fn set_title(title: &str) {
    if let Some(document) = document() {
        document.set_title(title);
    }
}

/// The version and build which the packer has written into the page.
pub fn build() -> String {
    document()
        .and_then(|document| {
            document
                .query_selector("meta[name=ventrail-build]")
                .ok()
                .flatten()
        })
        .and_then(|meta| meta.get_attribute("content"))
        .unwrap_or_default()
}

/// Opens the browser's print window.
pub fn print() {
    if let Some(window) = web_sys::window() {
        // Refused only where the browser allows no dialogs; its own menu prints all the same.
        let _ = window.print();
    }
}

fn document() -> Option<Document> {
    web_sys::window()?.document()
}
