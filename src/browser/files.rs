//! Files: read what the person picked or dropped, hand over a text to be saved. Nothing leaves the machine.

use js_sys::futures::{JsFuture, spawn_local};
use js_sys::{Array, Function, Object, Promise, Reflect};
use serde::Serialize;
use std::collections::BTreeMap;
use wasm_bindgen::closure::Closure;
use wasm_bindgen::{JsCast, JsValue};
use web_sys::{Blob, BlobPropertyBag, File, FileList, HtmlAnchorElement, HtmlInputElement, Url};

const TYPE: &str = "application/json";
const ENDING: &str = ".json";

/// A file which was picked, with what could be read of it.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Picked {
    /// Its name.
    pub name: String,
    /// Its text.
    pub content: Content,
}

/// The content of a picked file.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Content {
    /// Its text.
    Text(String),
    /// More bytes than were asked for; it was not read.
    TooLarge,
    /// The browser could not read it.
    Unreadable,
}

/// What became of a text which was to be saved.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Saved {
    /// It is in the file of this name.
    InFile(String),
    /// It was handed to the browser's downloads under this name.
    HandedOver(String),
    /// The person closed the window in which the place is chosen.
    GivenUp,
    /// The browser could not write it.
    Failed,
}

/// Opens the browser's file window of the file input with this id.
pub fn choose(input_id: &str) {
    if let Some(input) = super::page::element(input_id) {
        input.click();
    }
}

/// Reads the first file of a file input, and forgets it there so that the same file can be picked again.
pub fn read_chosen(input_id: &str, most_bytes: usize, act: impl FnOnce(Picked) + 'static) {
    let input = super::page::element(input_id).and_then(|found| found.dyn_into().ok());
    let Some(input): Option<HtmlInputElement> = input else {
        return;
    };
    read_first(input.files(), most_bytes, act);
    input.set_value("");
}

/// Reads the first file of those which were dropped on the page.
pub fn read_dropped(event: &web_sys::Event, most_bytes: usize, act: impl FnOnce(Picked) + 'static) {
    let transfer = event
        .dyn_ref::<web_sys::DragEvent>()
        .and_then(web_sys::DragEvent::data_transfer);
    read_first(
        transfer.and_then(|transfer| transfer.files()),
        most_bytes,
        act,
    );
}

fn read_first(files: Option<FileList>, most_bytes: usize, act: impl FnOnce(Picked) + 'static) {
    let Some(file) = files.and_then(|files| files.get(0)) else {
        return;
    };
    spawn_local(async move {
        act(Picked {
            name: file.name(),
            content: read(&file, most_bytes).await,
        });
    });
}

async fn read(file: &File, most_bytes: usize) -> Content {
    let most = u32::try_from(most_bytes).map_or(f64::MAX, f64::from);
    if file.size() > most {
        return Content::TooLarge;
    }
    let text = JsFuture::from(file.text()).await.ok();
    match text.and_then(|text| text.as_string()) {
        Some(text) => Content::Text(text),
        None => Content::Unreadable,
    }
}

/// Saves `text`: into a file of the person's choice where the browser can ask for one, else as a download.
/// Must be called while a click or a key press is handled.
pub fn save(name: &str, text: String, act: impl FnOnce(Saved) + 'static) {
    let Some(asked) = ask_for_place(name) else {
        act(download(name, &text));
        return;
    };
    spawn_local(async move {
        act(match write_into(asked, &text).await {
            Ok(name) => Saved::InFile(name),
            Err(refused) if is_given_up(&refused) => Saved::GivenUp,
            Err(_) => Saved::Failed,
        });
    });
}

/// Hands `text` to the browser's downloads under `name`.
pub fn download(name: &str, text: &str) -> Saved {
    match hand_over(name, text) {
        Some(()) => Saved::HandedOver(name.to_owned()),
        None => Saved::Failed,
    }
}

fn hand_over(name: &str, text: &str) -> Option<()> {
    let options = BlobPropertyBag::new();
    options.set_type(TYPE);
    let parts = Array::of1(&JsValue::from_str(text));
    let blob = Blob::new_with_str_sequence_and_options(&parts, &options).ok()?;
    let address = Url::create_object_url_with_blob(&blob).ok()?;
    let window = web_sys::window()?;
    let document = window.document()?;
    let anchor: HtmlAnchorElement = document.create_element("a").ok()?.dyn_into().ok()?;
    anchor.set_href(&address);
    anchor.set_download(name);
    document.body()?.append_child(&anchor).ok()?;
    anchor.click();
    anchor.remove();
    // Some browsers read the address only after the click is over.
    let revoke = Closure::once_into_js(move || {
        let _ = Url::revoke_object_url(&address);
    });
    window
        .set_timeout_with_callback_and_timeout_and_arguments_0(revoke.unchecked_ref(), 60_000)
        .ok()?;
    Some(())
}

/// What the browser's window for saving is asked for.
#[derive(Serialize)]
#[serde(rename_all = "camelCase")]
struct PlaceWanted<'a> {
    suggested_name: &'a str,
    types: [TypeWanted; 1],
}

#[derive(Serialize)]
struct TypeWanted {
    accept: BTreeMap<&'static str, [&'static str; 1]>,
}

/// The browser's promise of a place; `None` where it has no such window.
fn ask_for_place(name: &str) -> Option<Promise> {
    let window = web_sys::window()?;
    let ask: Function = Reflect::get(&window, &"showSaveFilePicker".into())
        .ok()?
        .dyn_into()
        .ok()?;
    let wanted = PlaceWanted {
        suggested_name: name,
        types: [TypeWanted {
            accept: BTreeMap::from([(TYPE, [ENDING])]),
        }],
    };
    // Maps must become plain objects, which is what the browser's windows read.
    let plain = serde_wasm_bindgen::Serializer::json_compatible();
    let wanted = wanted.serialize(&plain).ok()?;
    ask.call1(&window, &wanted).ok()?.dyn_into().ok()
}

async fn write_into(asked: Promise, text: &str) -> Result<String, JsValue> {
    let place = JsFuture::from(asked).await?;
    let stream = call(&place, "createWritable", &[]).await?;
    call(&stream, "write", &[text.into()]).await?;
    call(&stream, "close", &[]).await?;
    let name = Reflect::get(&place, &"name".into())?;
    Ok(name.as_string().unwrap_or_default())
}

async fn call(on: &JsValue, name: &str, with: &[JsValue]) -> Result<JsValue, JsValue> {
    let function: Function = Reflect::get(on, &name.into())?.dyn_into()?;
    let promise: Promise = function
        .apply(on, &with.iter().collect::<Array>())?
        .dyn_into()?;
    JsFuture::from(promise).await
}

fn is_given_up(refused: &JsValue) -> bool {
    let name = refused
        .dyn_ref::<Object>()
        .and_then(|refused| Reflect::get(refused, &"name".into()).ok());
    name.and_then(|name| name.as_string()).as_deref() == Some("AbortError")
}
