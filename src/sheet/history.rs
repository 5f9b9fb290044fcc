//! Undo and redo without limit: whole documents which share their unchanged items.

use super::{Document, Edit};

/// A document as it was before an edit, with that edit for its name.
#[derive(Debug, Clone, PartialEq)]
pub struct Step {
    /// What was done.
    pub edit: Edit,
    document: Document,
}

/// A document with the steps that led to it and those taken back.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct History {
    now: Document,
    past: Vec<Step>,
    future: Vec<Step>,
}

impl History {
    /// A history which starts at `document`.
    pub fn starting_at(document: Document) -> Self {
        Self {
            now: document,
            ..Self::default()
        }
    }

    /// The document as it stands.
    pub fn now(&self) -> &Document {
        &self.now
    }

    /// Does `edit` as one step; gives whether anything changed. What was taken back before is forgotten.
    pub fn edit(&mut self, edit: Edit) -> bool {
        let next = self.now.after(&edit);
        if next == self.now {
            return false;
        }
        let before = std::mem::replace(&mut self.now, next);
        self.past.push(Step {
            edit,
            document: before,
        });
        self.future.clear();
        true
    }

    /// The edit which [`History::undo`] would take back.
    pub fn undoable(&self) -> Option<&Edit> {
        self.past.last().map(|step| &step.edit)
    }

    /// The edit which [`History::redo`] would do again.
    pub fn redoable(&self) -> Option<&Edit> {
        self.future.last().map(|step| &step.edit)
    }

    /// Takes back the last edit; gives whether there was one.
    pub fn undo(&mut self) -> bool {
        let Some(step) = self.past.pop() else {
            return false;
        };
        let after = std::mem::replace(&mut self.now, step.document);
        self.future.push(Step {
            edit: step.edit,
            document: after,
        });
        true
    }

    /// Does the edit again which was taken back last; gives whether there was one.
    pub fn redo(&mut self) -> bool {
        let Some(step) = self.future.pop() else {
            return false;
        };
        let before = std::mem::replace(&mut self.now, step.document);
        self.past.push(Step {
            edit: step.edit,
            document: before,
        });
        true
    }
}
