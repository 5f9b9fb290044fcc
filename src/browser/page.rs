//! The page itself: elements by id, focus, title, print.

use wasm_bindgen::JsCast;
use web_sys::{Document, Element, EventTarget, HtmlElement, HtmlInputElement};

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
    super::on_next_frame(move || {
        focus(&id);
    });
}

/// As [`focus_soon`], and selects the text of an input.
pub fn focus_and_select_soon(id: String) {
    super::on_next_frame(move || {
        if focus(&id)
            && let Some(input) = element(&id).and_then(|found| found.dyn_into().ok())
        {
            let input: HtmlInputElement = input;
            input.select();
        }
    });
}

/// Brings the element with this id into view once the page has been brought up to date.
pub fn show_soon(id: String) {
    super::on_next_frame(move || {
        if let Some(element) = element(&id) {
            element.scroll_into_view();
        }
    });
}

/// The id of the element which has the focus.
pub fn focused_id() -> Option<String> {
    Some(document()?.active_element()?.id())
}

/// Whether the person is typing or choosing somewhere, so that keys belong to that place.
pub fn is_entering() -> bool {
    let focused = document().and_then(|document| document.active_element());
    focused.is_some_and(|element| is_entry(&element))
}

/// Whether an element takes keys of its own.
pub fn is_entry(element: &Element) -> bool {
    matches!(element.tag_name().as_str(), "INPUT" | "SELECT" | "TEXTAREA")
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

/// Sets an attribute of the element with this id, if it is there.
pub fn set_attribute(id: &str, name: &str, value: &str) {
    if let Some(element) = element(id) {
        // Fails only for names which are none.
        let _ = element.set_attribute(name, value);
    }
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
