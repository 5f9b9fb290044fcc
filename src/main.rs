//! The browser entry: puts the page into its place.
fn main() {
    ventrail::ui::start();
}
