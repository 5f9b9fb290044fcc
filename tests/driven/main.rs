//! Tests which drive the packed page, `dist/index.html`, in a real browser. `./dev test` builds the page and runs them.
//!
//! Each scenario gets a browser, a browser profile and a server of its own; how to write one stands at the head of
//! the module `harness`. A scenario belongs into the module of what it is about, one file each beside this one.

mod harness;
mod sheet;

mod exchanging;
mod handling;
mod keeping;
mod listing;
mod notices;
mod opening;
mod printing;
mod reading;
