//! What the page puts on paper: a PDF file, the text of its pages, and pictures of them.

use std::fs;
use std::path::{Path, PathBuf};
use std::process::Command;

use base64::Engine;
use base64::engine::general_purpose::STANDARD as BASE64;
use serde_json::json;
use thirtyfour::WebDriver;

use super::Outcome;

/// A size of paper, upright.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Paper {
    /// 210 mm × 297 mm.
    A4,
    /// 8.5 in × 11 in.
    Letter,
}

impl Paper {
    /// Width and height in inches, as the browser wants them.
    fn size_in(self) -> (f64, f64) {
        match self {
            Self::A4 => (210.0 / 25.4, 297.0 / 25.4),
            Self::Letter => (8.5, 11.0),
        }
    }
}

/// A print: the file, and what a reader can select in it, page by page.
#[derive(Debug)]
pub struct Print {
    /// The PDF file.
    pub file: PathBuf,
    /// The text of each page, laid out as on paper.
    pub pages: Vec<String>,
}

impl Print {
    /// The text of all pages.
    pub fn text(&self) -> String {
        self.pages.concat()
    }

    /// Makes a picture of each page beside the file, for looking at; gives the first's name up to its number.
    pub fn pictures(&self) -> Outcome<PathBuf> {
        let stem = self.file.with_extension("");
        run(Command::new("pdftoppm")
            .args(["-r", "80", "-png"])
            .arg(&self.file)
            .arg(&stem))?;
        Ok(stem)
    }
}

/// Prints the page as a person would with the browser's own settings, into `file`.
pub async fn print(driver: &WebDriver, paper: Paper, file: &Path) -> Outcome<Print> {
    let (width, height) = paper.size_in();
    let wishes = json!({ "paperWidth": width, "paperHeight": height, "printBackground": false, "generateTaggedPDF": true });
    let answer = driver.cdp().send_raw("Page.printToPDF", wishes).await?;
    let data = answer
        .get("data")
        .and_then(|data| data.as_str())
        .ok_or("the browser printed nothing")?;
    fs::write(file, BASE64.decode(data)?)?;
    let text = run(Command::new("pdftotext")
        .args(["-layout", "-enc", "UTF-8"])
        .arg(file)
        .arg("-"))?;
    // A form feed ends each page.
    let pages = text.split_terminator('\u{c}').map(str::to_owned).collect();
    Ok(Print {
        file: file.to_owned(),
        pages,
    })
}

fn run(command: &mut Command) -> Outcome<String> {
    let output = command
        .output()
        .map_err(|cause| format!("{command:?} does not run: {cause}; ./dev test installs it"))?;
    if output.status.success() {
        Ok(String::from_utf8(output.stdout)?)
    } else {
        Err(format!(
            "{command:?} failed: {}",
            String::from_utf8_lossy(&output.stderr)
        )
        .into())
    }
}
