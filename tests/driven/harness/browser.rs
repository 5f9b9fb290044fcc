//! The browser's driver, shared by all scenarios, and the browser of each.

use std::env;
use std::io::{BufRead, BufReader};
use std::path::{Path, PathBuf};
use std::process::{Child, Command, Stdio};
use std::sync::OnceLock;

use serde_json::json;
use thirtyfour::{ChromiumLikeCapabilities, DesiredCapabilities, LoggingPrefsLogLevel, WebDriver};

use super::Outcome;

/// Quiet, without a window, and without the sandbox that root may not use.
const FLAGS: [&str; 9] = [
    "--headless",
    "--no-sandbox",
    "--disable-gpu",
    "--disable-quic",
    "--no-first-run",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
    "--disable-dev-shm-usage",
];

/// Starts a browser whose profile lies in a folder; a second browser on the same folder finds what the first stored.
pub async fn start(profile: &Path) -> Outcome<WebDriver> {
    let mut wishes = DesiredCapabilities::chrome();
    for flag in FLAGS {
        wishes.add_arg(flag)?;
    }
    wishes.add_arg(&format!("--user-data-dir={}", profile.display()))?;
    wishes.add_arg("--window-size=1366,900")?;
    // The page which the browser shows by itself is a large one; an empty one is there sooner.
    wishes.add_experimental_option(
        "prefs",
        json!({ "session": { "restore_on_startup": 4, "startup_urls": ["about:blank"] } }),
    )?;
    if let Some(program) = env::var_os("CHROMIUM") {
        wishes.set_binary(&program.to_string_lossy())?;
    }
    wishes.set_logging_prefs("browser", LoggingPrefsLogLevel::All)?;
    wishes.set_logging_prefs("performance", LoggingPrefsLogLevel::All)?;
    Ok(WebDriver::new(driver_address()?, wishes).await?)
}

/// Where the driver listens; the first to ask starts it.
fn driver_address() -> Outcome<String> {
    static DRIVER: OnceLock<Result<Driver, String>> = OnceLock::new();
    let driver = DRIVER.get_or_init(|| Driver::start().map_err(|fault| fault.to_string()));
    driver
        .as_ref()
        .map(|driver| driver.address.clone())
        .map_err(|fault| fault.clone().into())
}

/// The driver's process. It ends with the tests, even when those are killed: a shell beside it waits for the end of
/// its own input, which the tests hold open as long as they run, and then ends the driver by its process id.
struct Driver {
    address: String,
    _guard: Child,
}

const GUARD: &str = r#""$0" --port=0 --log-level=SEVERE & driver=$!; cat >/dev/null; exec 2>/dev/null; kill "$driver"; wait "$driver""#;

impl Driver {
    fn start() -> Outcome<Self> {
        let program = env::var_os("CHROMEDRIVER")
            .map_or_else(|| PathBuf::from("chromedriver"), PathBuf::from);
        let mut guard = Command::new("sh")
            .arg("-c")
            .arg(GUARD)
            .arg(&program)
            .stdin(Stdio::piped())
            .stdout(Stdio::piped())
            .spawn()
            .map_err(|cause| format!("the browser's driver does not start: {cause}"))?;
        let said = guard
            .stdout
            .take()
            .ok_or("the browser's driver is silent")?;
        for line in BufReader::new(said).lines() {
            let line = line?;
            if let Some((_, port)) = line.split_once("started successfully on port ") {
                let address = format!("http://127.0.0.1:{}", port.trim_end_matches('.'));
                return Ok(Self {
                    address,
                    _guard: guard,
                });
            }
        }
        Err(format!(
            "{} did not start; ./dev test installs it",
            program.display()
        )
        .into())
    }
}
