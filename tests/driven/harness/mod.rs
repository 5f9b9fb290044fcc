//! What every driven scenario stands on. A scenario is a test like this one:
//!
//! ```text
//! #[test]
//! fn title_is_shown() -> Outcome {
//!     drive(async |page| {
//!         page.open().await?;
//!         assert_eq!(page.title().await?, "Ventrail");
//!         Ok(())
//!     })
//! }
//! ```
//!
//! [`drive`] starts a browser with a fresh profile and a server which serves `dist/` and writes down each request; it
//! ends both again, however the scenario goes. After a scenario that went well it also asserts that the browser's log
//! holds no error and that nothing but the page's own file was asked for; a scenario which provokes an error says so
//! beforehand with [`Page::expect_complaint`]. Of a scenario that failed it keeps a picture and the browser's log in
//! the folder named in the failure.
//!
//! What a [`Page`] can do:
//!
//! | wish | calls |
//! | --- | --- |
//! | open the page | [`open`](Page::open), [`open_from_disk`](Page::open_from_disk), [`reload`](Page::reload), [`reopen_browser`](Page::reopen_browser), [`before_load`](Page::before_load), [`without_file_pickers`](Page::without_file_pickers) |
//! | find and read | [`find`](Page::find), [`find_all`](Page::find_all), [`text`](Page::text), [`texts`](Page::texts), [`is_shown`](Page::is_shown), [`title`](Page::title), [`script`](Page::script), [`slow_script`](Page::slow_script), [`stored`](Page::stored) |
//! | act like a person | [`click`](Page::click), [`press`](Page::press), [`enter`](Page::enter), [`paste`](Page::paste), [`upload`](Page::upload), [`upload_text`](Page::upload_text) |
//! | wait for it | [`wait_until`](Page::wait_until), [`wait_for_text`](Page::wait_for_text), [`wait_for_download`](Page::wait_for_download); `find`, `click` and `text` wait by themselves |
//! | change the world | [`go_offline`](Page::go_offline), [`go_online`](Page::go_online), [`stop_server`](Page::stop_server), [`resize`](Page::resize), [`prefer`](Page::prefer), [`slow_down`](Page::slow_down) |
//! | look at results | [`print`](Page::print), [`picture`](Page::picture), [`requests`](Page::requests), [`asked_for`](Page::asked_for), [`log`](Page::log), [`accessibility_faults`](Page::accessibility_faults) |
//! | anything else | [`driver`](Page::driver), [`devtools`](Page::devtools) |
//!
//! Elements are named by CSS selectors. Nothing here sleeps for a fixed time: what takes a while is polled until it
//! holds, and a scenario that waits in vain says what it waited for.
//!
//! Not here: any scenario, and anything that knows of sheets or feeders. Start reading at [`drive`].

mod browser;
mod page;
mod paper;
mod site;

use std::error::Error;
use std::future::{Future, poll_fn};
use std::panic::{AssertUnwindSafe, catch_unwind, resume_unwind};
use std::path::PathBuf;
use std::pin::pin;
use std::thread;
use std::time::Duration;

pub use page::{Page, Preference};
pub use paper::Paper;
pub use thirtyfour::Key;

/// What a scenario ends with, or a step in it.
pub type Outcome<T = ()> = Result<T, Fault>;

/// Why a step could not be done; a wrong result is a failed assertion instead.
pub type Fault = Box<dyn Error + Send + Sync>;

/// No scenario may take longer; one that does hangs.
const LONGEST_SCENARIO: Duration = Duration::from_secs(120);

/// Runs one scenario in a browser of its own, and checks afterwards that the browser had nothing to complain about.
///
/// # Errors
/// What the scenario ended with, or why the browser could not be had.
pub fn drive(scenario: impl AsyncFnOnce(&mut Page) -> Outcome) -> Outcome {
    let runtime = tokio::runtime::Builder::new_multi_thread()
        .worker_threads(1)
        .enable_all()
        .build()?;
    runtime.block_on(async {
        let mut page = Page::start(&evidence_folder()).await?;
        let end = until_panic(async {
            tokio::time::timeout(LONGEST_SCENARIO, scenario(&mut page)).await??;
            page.check_quiet().await
        })
        .await;
        if !matches!(end, Ok(Ok(()))) {
            page.keep_evidence().await;
        }
        page.quit().await;
        end.unwrap_or_else(|panic| resume_unwind(panic))
    })
}

/// Where pictures and prints of the running test are put: a folder of the test's own name.
fn evidence_folder() -> PathBuf {
    let test = thread::current()
        .name()
        .unwrap_or("unnamed")
        .replace("::", "-");
    PathBuf::from(env!("CARGO_TARGET_TMPDIR"))
        .join("driven")
        .join(test)
}

/// The outcome of a future, where a panic is an outcome too, so that the browser can be ended after it.
async fn until_panic<T>(future: impl Future<Output = T>) -> thread::Result<T> {
    let mut future = pin!(future);
    poll_fn(
        |context| match catch_unwind(AssertUnwindSafe(|| future.as_mut().poll(context))) {
            Ok(poll) => poll.map(Ok),
            Err(panic) => std::task::Poll::Ready(Err(panic)),
        },
    )
    .await
}
