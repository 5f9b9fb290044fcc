//! What holders and files are called.

use crate::sheet::{Document, Edit, Item};
use crate::words::page;
use crate::working::{Field, Holder, HolderId};
use std::sync::Arc;

/// The name of a holder: tag of a feeder, name of a source, or its row where it has none.
pub(super) fn holder(document: &Document, holder: Holder) -> String {
    let sheet = &document.sheet;
    match holder {
        Holder::Sheet => page::the_panel().to_owned(),
        Holder::Feeder(id) => {
            named(&sheet.feeders, id, Field::Tag).unwrap_or_else(page::untagged_feeder)
        }
        Holder::Source(id) => {
            named(&sheet.sources, id, Field::SourceName).unwrap_or_else(page::unnamed_source)
        }
    }
}

/// The name of a feeder or a source, whichever has this identity.
pub(super) fn item(document: &Document, id: HolderId) -> String {
    let has = |items: &[Arc<Item>]| items.iter().any(|item| item.id == id);
    if has(&document.sheet.feeders) {
        holder(document, Holder::Feeder(id))
    } else if has(&document.sheet.sources) {
        holder(document, Holder::Source(id))
    } else {
        page::a_row().to_owned()
    }
}

/// What an edit does.
pub(super) fn edit(edit: &Edit, document: &Document) -> String {
    page::edit_name(edit, |id| item(document, id))
}

/// The name of an item, or else its row, counted from one.
fn named(items: &[Arc<Item>], id: HolderId, field: Field) -> Result<String, usize> {
    let row = items.iter().position(|item| item.id == id).unwrap_or(0);
    match items.get(row).map(|item| item.record.text(field)) {
        Some(name) if !name.is_empty() => Ok(name.to_owned()),
        _ => Err(row + 1),
    }
}

/// The name under which the document is offered as a file, from the name of the sheet and its issue.
pub(super) fn file(document: &Document) -> String {
    let record = &document.sheet.record;
    let mut name = String::new();
    for word in [record.text(Field::SheetName), record.text(Field::Issue)]
        .join(" ")
        .split(|letter: char| !letter.is_alphanumeric())
        .filter(|word| !word.is_empty())
    {
        if !name.is_empty() {
            name.push('-');
        }
        name.push_str(&word.to_lowercase());
    }
    if name.is_empty() {
        name.push_str(page::default_file_name());
    }
    name.push_str(".json");
    name
}

/// The title of the document; a browser offers it for a printed file.
pub(super) fn title(document: &Document) -> String {
    let record = &document.sheet.record;
    match record.text(Field::SheetName) {
        "" => page::program().to_owned(),
        name => page::print_head(name, record.text(Field::Issue), ""),
    }
}
