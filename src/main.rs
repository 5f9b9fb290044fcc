//! The browser entry: mounts the page.
fn main() {}
