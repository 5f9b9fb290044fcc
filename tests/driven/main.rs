//! Tests which drive the packed page in a real browser.
