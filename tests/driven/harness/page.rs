//! The page under test, as a person sees and handles it. See the head of the module above for the list of calls.

use std::env;
use std::fs;
use std::path::{Path, PathBuf};
use std::process;
use std::sync::atomic::{AtomicUsize, Ordering};
use std::time::{Duration, Instant};

use serde_json::{Value, json};
use thirtyfour::{By, TypingData, WebDriver, WebElement};

use super::paper::{self, Paper, Print};
use super::site::{self, Site};
use super::{Outcome, browser};

/// How long a thing that is to come is waited for.
const PATIENCE: Duration = Duration::from_secs(10);

/// How often it is looked for meanwhile.
const LOOK_AGAIN: Duration = Duration::from_millis(15);

/// A browser with the page in it, its server, and the folder of its evidence.
pub struct Page {
    driver: WebDriver,
    site: Site,
    scratch: Scratch,
    evidence: PathBuf,
    log: Vec<String>,
    asked_for: Vec<String>,
    expected: Vec<String>,
    scripts_before_load: Vec<String>,
}

/// What the person's system asks of pages.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Preference {
    /// Dark ink on light paper.
    Light,
    /// Light ink on dark paper.
    Dark,
    /// Colours chosen by the person, few of them.
    ForcedColors,
}

impl Page {
    /// Starts server and browser.
    pub(super) async fn start(evidence: &Path) -> Outcome<Self> {
        if evidence.exists() {
            fs::remove_dir_all(evidence)?;
        }
        fs::create_dir_all(evidence)?;
        let scratch = Scratch::new()?;
        let site = Site::start()?;
        let driver = browser::start(&scratch.profile()).await?;
        let page = Self {
            driver,
            site,
            scratch,
            evidence: evidence.to_owned(),
            log: Vec::new(),
            asked_for: Vec::new(),
            expected: Vec::new(),
            scripts_before_load: Vec::new(),
        };
        page.set_up_browser().await?;
        Ok(page)
    }

    async fn set_up_browser(&self) -> Outcome {
        let folder = self.scratch.downloads();
        self.devtools(
            "Browser.setDownloadBehavior",
            json!({ "behavior": "allow", "downloadPath": folder }),
        )
        .await?;
        for script in &self.scripts_before_load {
            self.devtools(
                "Page.addScriptToEvaluateOnNewDocument",
                json!({ "source": script }),
            )
            .await?;
        }
        Ok(())
    }

    // --- opening ---

    /// Opens the page from its server.
    pub async fn open(&self) -> Outcome {
        self.driver.goto(self.site.address()).await?;
        Ok(())
    }

    /// Opens the page from the disk, as by a double click.
    pub async fn open_from_disk(&self) -> Outcome {
        self.driver
            .goto(format!("file://{}", site::packed_page()?.display()))
            .await?;
        Ok(())
    }

    /// Opens another page of the same server, which gives this text.
    pub async fn open_other(&self, text: &str) -> Outcome {
        self.site.add("/other", text);
        self.driver
            .goto(format!("{}other", self.site.address()))
            .await?;
        Ok(())
    }

    /// Loads the page again, as by the browser's button.
    pub async fn reload(&self) -> Outcome {
        self.driver.refresh().await?;
        Ok(())
    }

    /// Ends the browser and starts it again with the same profile, so what it stored is there.
    pub async fn reopen_browser(&mut self) -> Outcome {
        self.gather().await?;
        self.driver.clone().quit().await?;
        self.driver = browser::start(&self.scratch.profile()).await?;
        self.set_up_browser().await
    }

    /// Runs a script in every page opened from now on, before any script of its own.
    pub async fn before_load(&mut self, script: &str) -> Outcome {
        self.scripts_before_load.push(script.to_owned());
        self.devtools(
            "Page.addScriptToEvaluateOnNewDocument",
            json!({ "source": script }),
        )
        .await?;
        Ok(())
    }

    /// Takes from the browser its own dialogs for files, which no test can answer: pages opened from now on have to
    /// save by download and to open by `<input type="file">`, as in a browser without those dialogs.
    pub async fn without_file_pickers(&mut self) -> Outcome {
        self.before_load("delete window.showSaveFilePicker; delete window.showOpenFilePicker;")
            .await
    }

    // --- finding and reading ---

    /// The first element of a selector, waited for.
    pub async fn find(&self, selector: &str) -> Outcome<WebElement> {
        let began = Instant::now();
        loop {
            match self.driver.find(By::Css(selector)).await {
                Ok(element) => return Ok(element),
                Err(cause) if began.elapsed() > PATIENCE => {
                    return Err(format!("there is no {selector} on the page: {cause}").into());
                }
                Err(_) => tokio::time::sleep(LOOK_AGAIN).await,
            }
        }
    }

    /// All elements of a selector which are there now.
    pub async fn find_all(&self, selector: &str) -> Outcome<Vec<WebElement>> {
        Ok(self.driver.find_all(By::Css(selector)).await?)
    }

    /// The text a person sees in the first element of a selector; of a field, its content.
    pub async fn text(&self, selector: &str) -> Outcome<String> {
        let element = self.find(selector).await?;
        let tag = element.tag_name().await?;
        if matches!(tag.as_str(), "input" | "textarea" | "select") {
            return Ok(element.prop("value").await?.unwrap_or_default());
        }
        Ok(element.text().await?)
    }

    /// The seen texts of all elements of a selector, in the order of the page.
    pub async fn texts(&self, selector: &str) -> Outcome<Vec<String>> {
        let script =
            "return [...document.querySelectorAll(arguments[0])].map(element => element.innerText)";
        Ok(serde_json::from_value(
            self.script(script, &[json!(selector)]).await?,
        )?)
    }

    /// Whether an element of the selector is there and to be seen.
    pub async fn is_shown(&self, selector: &str) -> Outcome<bool> {
        let script = "return [...document.querySelectorAll(arguments[0])].some(element => element.checkVisibility())";
        Ok(self.script(script, &[json!(selector)]).await? == json!(true))
    }

    /// The title of the document.
    pub async fn title(&self) -> Outcome<String> {
        Ok(self.driver.title().await?)
    }

    /// Runs the body of a function in the page, with `arguments`, and gives what it returns.
    pub async fn script(&self, body: &str, arguments: &[Value]) -> Outcome<Value> {
        Ok(self
            .driver
            .execute(body, arguments.to_vec())
            .await?
            .json()
            .clone())
    }

    /// As [`script`](Self::script), but the function calls its last argument with its result when it has one.
    pub async fn slow_script(&self, body: &str, arguments: &[Value]) -> Outcome<Value> {
        Ok(self
            .driver
            .execute_async(body, arguments.to_vec())
            .await?
            .json()
            .clone())
    }

    /// What the browser's store (`localStorage`) holds under a key.
    pub async fn stored(&self, key: &str) -> Outcome<Option<String>> {
        let value = self
            .script("return localStorage.getItem(arguments[0])", &[json!(key)])
            .await?;
        Ok(value.as_str().map(str::to_owned))
    }

    // --- acting ---

    /// Clicks on the first element of a selector, once it is there.
    pub async fn click(&self, selector: &str) -> Outcome {
        self.find(selector).await?.click().await?;
        Ok(())
    }

    /// Presses keys where the focus is: a text, one [`Key`](super::Key), or several as in `Key::Control + "z"`.
    pub async fn press(&self, keys: impl Into<TypingData>) -> Outcome {
        self.driver.active_element().await?.send_keys(keys).await?;
        Ok(())
    }

    /// Replaces what a field holds, and leaves it with Tab, so that the page takes the entry.
    pub async fn enter(&self, selector: &str, text: &str) -> Outcome {
        let field = self.find(selector).await?;
        field.click().await?;
        field.send_keys(thirtyfour::Key::Control + "a").await?;
        field.send_keys(text).await?;
        field.send_keys(thirtyfour::Key::Tab).await?;
        Ok(())
    }

    /// Pastes a text where the focus is. The event is like the browser's own, but a text field does not take the text
    /// by itself: it is for places where the page handles the paste.
    pub async fn paste(&self, text: &str) -> Outcome {
        let script = "const held = new DataTransfer(); held.setData('text/plain', arguments[0]);
            document.activeElement.dispatchEvent(
                new ClipboardEvent('paste', { clipboardData: held, bubbles: true, cancelable: true, composed: true }));";
        self.script(script, &[json!(text)]).await?;
        Ok(())
    }

    /// Hands a file to the `<input type="file">` of a selector.
    pub async fn upload(&self, selector: &str, file: &Path) -> Outcome {
        self.find(selector)
            .await?
            .send_keys(file.display().to_string())
            .await?;
        Ok(())
    }

    /// As [`upload`](Self::upload), with a file of this name and text made for it.
    pub async fn upload_text(&self, selector: &str, name: &str, text: &str) -> Outcome {
        let file = self.scratch.0.join(name);
        fs::write(&file, text)?;
        self.upload(selector, &file).await
    }

    // --- waiting ---

    /// Waits until a condition holds; `what` says in the failure what did not come about.
    pub async fn wait_until(
        &self,
        what: &str,
        condition: impl AsyncFn() -> Outcome<bool>,
    ) -> Outcome {
        let began = Instant::now();
        while !condition().await? {
            if began.elapsed() > PATIENCE {
                return Err(format!("waited {} s in vain until {what}", PATIENCE.as_secs()).into());
            }
            tokio::time::sleep(LOOK_AGAIN).await;
        }
        Ok(())
    }

    /// Waits until the seen text of an element holds a part.
    pub async fn wait_for_text(&self, selector: &str, part: &str) -> Outcome {
        let what = format!("{selector} says \"{part}\"");
        self.wait_until(&what, async || {
            Ok(self
                .texts(selector)
                .await?
                .iter()
                .any(|text| text.contains(part)))
        })
        .await
    }

    /// Waits until a file of this name is downloaded whole, and gives its text.
    pub async fn wait_for_download(&self, name: &str) -> Outcome<String> {
        let file = self.scratch.downloads().join(name);
        // The browser writes under another name first and renames the file when it is whole.
        self.wait_until(
            &format!("{name} is downloaded"),
            async || Ok(file.is_file()),
        )
        .await?;
        Ok(fs::read_to_string(file)?)
    }

    // --- changing the world ---

    /// Takes the network away from the page.
    pub async fn go_offline(&self) -> Outcome {
        self.set_network(true).await
    }

    /// Gives the network back.
    pub async fn go_online(&self) -> Outcome {
        self.set_network(false).await
    }

    async fn set_network(&self, is_offline: bool) -> Outcome {
        self.devtools("Network.enable", json!({})).await?;
        let state = json!({ "offline": is_offline, "latency": 0, "downloadThroughput": -1, "uploadThroughput": -1 });
        self.devtools("Network.emulateNetworkConditions", state)
            .await?;
        Ok(())
    }

    /// Ends the page's server: whatever is asked of it from now on is refused.
    pub fn stop_server(&mut self) {
        self.site.stop();
    }

    /// Gives the page a window of this size in CSS pixels.
    pub async fn resize(&self, width: u32, height: u32) -> Outcome {
        let size =
            json!({ "width": width, "height": height, "deviceScaleFactor": 1, "mobile": false });
        self.devtools("Emulation.setDeviceMetricsOverride", size)
            .await?;
        Ok(())
    }

    /// Sets what the person's system asks of pages.
    pub async fn prefer(&self, preference: Preference) -> Outcome {
        let (name, value) = match preference {
            Preference::Light => ("prefers-color-scheme", "light"),
            Preference::Dark => ("prefers-color-scheme", "dark"),
            Preference::ForcedColors => ("forced-colors", "active"),
        };
        self.devtools(
            "Emulation.setEmulatedMedia",
            json!({ "features": [{ "name": name, "value": value }] }),
        )
        .await?;
        Ok(())
    }

    /// Makes the machine seem slower by a factor, as an old laptop is.
    pub async fn slow_down(&self, factor: u32) -> Outcome {
        self.devtools("Emulation.setCPUThrottlingRate", json!({ "rate": factor }))
            .await?;
        Ok(())
    }

    // --- results ---

    /// Prints the page; file and text are kept as evidence under this name.
    pub async fn print(&self, paper: Paper, name: &str) -> Outcome<Print> {
        paper::print(
            &self.driver,
            paper,
            &self.evidence.join(format!("{name}.pdf")),
        )
        .await
    }

    /// Takes a picture of what is seen, kept as evidence under this name.
    pub async fn picture(&self, name: &str) -> Outcome<PathBuf> {
        let file = self.evidence.join(format!("{name}.png"));
        self.driver.screenshot(&file).await?;
        Ok(file)
    }

    /// What the server was asked for, as method and path.
    pub fn requests(&self) -> Vec<String> {
        self.site.requests()
    }

    /// Every address the browser asked for on behalf of the page, also those that went elsewhere or never got out.
    pub async fn asked_for(&mut self) -> Outcome<&[String]> {
        self.gather().await?;
        Ok(&self.asked_for)
    }

    /// The browser's log: all that scripts wrote to the console, and the browser's own complaints, each with its level.
    pub async fn log(&mut self) -> Outcome<&[String]> {
        self.gather().await?;
        Ok(&self.log)
    }

    /// Says that a complaint holding this text is going to be provoked, and is no fault.
    pub fn expect_complaint(&mut self, part: &str) {
        self.expected.push(part.to_owned());
    }

    /// What the accessibility checker finds wrong in the page as it stands: one line for each rule broken.
    pub async fn accessibility_faults(&self) -> Outcome<Vec<String>> {
        let checker =
            Path::new(env!("CARGO_MANIFEST_DIR")).join(".tools/node_modules/axe-core/axe.min.js");
        let source = fs::read_to_string(&checker)
            .map_err(|cause| format!("{}: {cause}; ./dev test installs it", checker.display()))?;
        self.script(&format!("{source}; window.axe = window.axe || axe;"), &[])
            .await?;
        let script = "const done = arguments[arguments.length - 1];
            axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'], resultTypes: ['violations'] })
               .then(found => done(found.violations.map(fault =>
                    fault.id + ': ' + fault.help + ' at ' + fault.nodes.map(node => node.target.join(' ')).join(', '))),
                  fault => done(['the checker itself failed: ' + fault]));";
        Ok(serde_json::from_value(
            self.slow_script(script, &[]).await?,
        )?)
    }

    // --- anything else ---

    /// The driver itself, for what has no call here.
    pub fn driver(&self) -> &WebDriver {
        &self.driver
    }

    /// A command of the browser's developer tools.
    pub async fn devtools(&self, command: &str, parameters: Value) -> Outcome<Value> {
        Ok(self.driver.cdp().send_raw(command, parameters).await?)
    }

    // --- the end ---

    /// Takes over what the browser has logged since the last time; it forgets what it has told.
    async fn gather(&mut self) -> Outcome {
        for entry in self.driver.get_log("browser").await? {
            self.log.push(format!("{}: {}", entry.level, entry.message));
        }
        for entry in self.driver.get_log("performance").await? {
            let event: Value = serde_json::from_str(&entry.message)?;
            if event.pointer("/message/method") == Some(&json!("Network.requestWillBeSent")) {
                let address = event
                    .pointer("/message/params/request/url")
                    .and_then(Value::as_str);
                self.asked_for.extend(address.map(str::to_owned));
            }
        }
        Ok(())
    }

    /// Asserts that the browser has nothing to complain about, save what was expected, and that the page asked for
    /// nothing but itself. (The browser's own pages, such as the one of a new tab, come from inside it.)
    pub(super) async fn check_quiet(&mut self) -> Outcome {
        self.gather().await?;
        let is_expected = |line: &&String| {
            self.expected
                .iter()
                .any(|part| line.contains(part.as_str()))
        };
        let complaints: Vec<_> = self
            .log
            .iter()
            .filter(|line| line.starts_with("SEVERE") && !is_expected(line))
            .collect();
        assert!(
            complaints.is_empty(),
            "the browser complains: {complaints:#?}"
        );

        let own = self.site.address();
        let is_own = |address: &str| {
            let path = address.strip_prefix(&own);
            path.is_some_and(|path| path.is_empty() || path == "other")
                || ["data:", "blob:", "about:", "chrome:"]
                    .iter()
                    .any(|scheme| address.starts_with(scheme))
                || address.starts_with("file://") && address.ends_with("/dist/index.html")
        };
        let strange: Vec<_> = self
            .asked_for
            .iter()
            .filter(|address| !is_own(address) && !is_expected(address))
            .collect();
        assert!(
            strange.is_empty(),
            "the page asked for more than itself: {strange:#?}"
        );
        Ok(())
    }

    /// Keeps a picture and the log of a scenario that failed, and says where.
    pub(super) async fn keep_evidence(&mut self) {
        // The scenario has failed already; what cannot be kept now is not worth another failure.
        let _picture = self.picture("failed").await;
        let _log = self.gather().await;
        let told = format!(
            "log:\n{}\n\nasked for:\n{}\n",
            self.log.join("\n"),
            self.asked_for.join("\n")
        );
        let _file = fs::write(self.evidence.join("failed.txt"), told);
        eprintln!("picture and log are in {}", self.evidence.display());
    }

    /// Ends the browser.
    pub(super) async fn quit(self) {
        // A browser that cannot be asked any more ends with its driver.
        let _gone = self.driver.quit().await;
    }
}

/// A folder that lasts as long as its scenario.
struct Scratch(PathBuf);

impl Scratch {
    fn new() -> Outcome<Self> {
        static COUNT: AtomicUsize = AtomicUsize::new(0);
        let name = format!(
            "ventrail-driven-{}-{}",
            process::id(),
            COUNT.fetch_add(1, Ordering::Relaxed)
        );
        let scratch = Self(env::temp_dir().join(name));
        fs::create_dir_all(scratch.downloads())?;
        Ok(scratch)
    }

    fn profile(&self) -> PathBuf {
        self.0.join("profile")
    }

    fn downloads(&self) -> PathBuf {
        self.0.join("downloads")
    }
}

impl Drop for Scratch {
    fn drop(&mut self) {
        // The browser may still be writing its last file; the system clears its temporary folder in the end.
        let _left = fs::remove_dir_all(&self.0);
    }
}
