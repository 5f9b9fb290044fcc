//! Each rule reproduces what other computers give: libraries of air and heat, and closed forms.
//!
//! The rows lie in `tests/independent/`; the library and its version are the ground of each.

#[path = "../examples/reference/mod.rs"]
mod reference;

#[test]
fn every_independent_row_is_reproduced() {
    reference::folder::check("independent");
}
