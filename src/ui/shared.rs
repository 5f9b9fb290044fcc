//! Parts of the worked sheet as signals carry them.

use std::ops::Deref;
use std::sync::Arc;

/// A shared value which equals another only if both are the very same one. What was worked again is never the same, so
/// a change is seen without comparing figures.
#[derive(Debug)]
pub(super) struct Shared<T>(Arc<T>);

impl<T> Shared<T> {
    pub(super) fn new(value: T) -> Self {
        Self(Arc::new(value))
    }
}

impl<T> From<&Arc<T>> for Shared<T> {
    fn from(shared: &Arc<T>) -> Self {
        Self(Arc::clone(shared))
    }
}

impl<T> Clone for Shared<T> {
    fn clone(&self) -> Self {
        Self(Arc::clone(&self.0))
    }
}

impl<T> PartialEq for Shared<T> {
    fn eq(&self, other: &Self) -> bool {
        Arc::ptr_eq(&self.0, &other.0)
    }
}

impl<T> Deref for Shared<T> {
    type Target = T;
    fn deref(&self) -> &T {
        &self.0
    }
}
