//! The browser's clock, as texts in local time.

use js_sys::Date;

/// The date of today, `2026-03-31`.
pub fn today() -> String {
    let now = Date::new_0();
    format!(
        "{:04}-{:02}-{:02}",
        now.get_full_year(),
        now.get_month() + 1,
        now.get_date()
    )
}

/// The time of day, `14:02`.
pub fn time_of_day() -> String {
    let now = Date::new_0();
    format!("{:02}:{:02}", now.get_hours(), now.get_minutes())
}

/// A text which no other call gives, in whatever tab.
pub fn stamp() -> String {
    format!("{} {}", Date::now(), js_sys::Math::random())
}
