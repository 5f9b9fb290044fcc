//! The margin notes of the page, each with a name which outlives an edit.

use crate::file;
use crate::sheet::NoteRef;
use crate::words::page;
use crate::working::{Grade, Holder, MarginNote, Place};
use std::collections::{BTreeMap, BTreeSet};

/// Names a margin note on the page. Notes of one kind at one place are counted.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub(super) struct Key {
    pub(super) place: Place,
    kind: &'static str,
    count: usize,
}

/// All margin notes, gravest first.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct Notes {
    list: Vec<(Key, MarginNote)>,
    by_key: BTreeMap<Key, usize>,
    grades: BTreeMap<Holder, BTreeSet<Grade>>,
}

impl Key {
    /// The name under which the note is answered.
    pub(super) fn note_ref(self) -> NoteRef {
        NoteRef {
            place: self.place,
            kind: self.kind.to_owned(),
        }
    }

    /// The id of the note's element.
    pub(super) fn id(self) -> String {
        let holder = match self.place.holder {
            Holder::Sheet => "sheet".to_owned(),
            Holder::Feeder(id) => format!("feeder-{}", id.0),
            Holder::Source(id) => format!("source-{}", id.0),
        };
        let field = file::field_name(self.place.field).replace('.', "-");
        format!("note-{holder}-{field}-{}-{}", self.kind, self.count)
    }
}

impl Notes {
    /// The notes, gravest first and otherwise in their order.
    pub(super) fn new(mut notes: Vec<MarginNote>) -> Self {
        notes.sort_by_key(|note| note.grade);
        let mut counts: BTreeMap<(Place, &'static str), usize> = BTreeMap::new();
        let mut by_key = BTreeMap::new();
        let mut grades: BTreeMap<Holder, BTreeSet<Grade>> = BTreeMap::new();
        let list = notes
            .into_iter()
            .enumerate()
            .map(|(position, note)| {
                let kind = note.kind.id();
                let known = counts.entry((note.place, kind)).or_default();
                let key = Key {
                    place: note.place,
                    kind,
                    count: *known,
                };
                *known += 1;
                by_key.insert(key, position);
                grades
                    .entry(note.place.holder)
                    .or_default()
                    .insert(note.grade);
                (key, note)
            })
            .collect();
        Self {
            list,
            by_key,
            grades,
        }
    }

    /// The grades of what is noted at a feeder or source, gravest first: those of the sheet's own rules too.
    pub(super) fn grades_at(&self, holder: Holder) -> Vec<Grade> {
        let grades = self.grades.get(&holder).into_iter().flatten();
        grades.copied().collect()
    }

    /// Each with its name.
    pub(super) fn list(&self) -> &[(Key, MarginNote)] {
        &self.list
    }

    /// The names in their order.
    pub(super) fn keys(&self) -> Vec<Key> {
        self.list.iter().map(|(key, _)| *key).collect()
    }

    /// The note with this name.
    pub(super) fn get(&self, key: Key) -> Option<&MarginNote> {
        let position = self.by_key.get(&key)?;
        self.list.get(*position).map(|(_, note)| note)
    }

    /// How many there are of each grade, in words.
    pub(super) fn counts(&self) -> String {
        page::grade_counts(
            self.of(Grade::Stop),
            self.of(Grade::Query),
            self.of(Grade::Note),
        )
    }

    /// How many there are of a grade.
    pub(super) fn of(&self, grade: Grade) -> usize {
        self.list
            .iter()
            .filter(|(_, note)| note.grade == grade)
            .count()
    }
}
