//! What holders and files are called.

use crate::sheet::{Document, Edit, Item};
use crate::words::page;
use crate::working::{Field, Holder, HolderId};
use std::collections::BTreeMap;
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

/// The names of all feeders and sources.
pub(super) fn all(document: &Document) -> BTreeMap<HolderId, String> {
    let sheet = &document.sheet;
    let feeders = sheet.feeders.iter().enumerate().map(|(row, item)| {
        let name = name_or_row(item, Field::Tag, row).unwrap_or_else(page::untagged_feeder);
        (item.id, name)
    });
    let sources = sheet.sources.iter().enumerate().map(|(row, item)| {
        let name = name_or_row(item, Field::SourceName, row).unwrap_or_else(page::unnamed_source);
        (item.id, name)
    });
    feeders.chain(sources).collect()
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
    let found = items.iter().enumerate().find(|(_, item)| item.id == id);
    found.map_or(Err(0), |(row, item)| name_or_row(item, field, row))
}

fn name_or_row(item: &Item, field: Field, row: usize) -> Result<String, usize> {
    match item.record.text(field) {
        "" => Err(row + 1),
        name => Ok(name.to_owned()),
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
