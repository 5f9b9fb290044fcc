//! What scenarios about the sheet share: the demo, cells and totals by name, and what is kept.

use serde_json::json;

use crate::harness::{Key, Outcome, Page};

/// The key under which the sheet is kept in the browser's store.
pub const KEPT: &str = "ventrail/1/sheet";

/// The columns of the feeder list which scenarios look at.
pub mod column {
    pub const TAG: usize = 0;
    pub const LOAD: usize = 1;
    pub const DUTY: usize = 2;
    pub const MOTOR_POWER: usize = 3;
    pub const MOTOR_CURRENT: usize = 4;
    pub const DRIVE_INPUT: usize = 5;
    pub const RATING: usize = 7;
    pub const CONDUCTORS_AHEAD: usize = 9;
    pub const RUN_BEHIND: usize = 11;
    pub const HEAT: usize = 15;
    pub const LAST: usize = 16;
}

/// Opens the page with the demo of the brine hall in it.
pub async fn open_demo(page: &Page) -> Outcome {
    page.open().await?;
    page.click(".demo").await?;
    page.find("#cell-0-0").await?;
    Ok(())
}

/// The selector of a cell.
pub fn cell(feeder: u32, column: usize) -> String {
    format!("#cell-{feeder}-{column}")
}

/// The value a person sees in a cell.
pub async fn value(page: &Page, feeder: u32, column: usize) -> Outcome<String> {
    let script = "const value = document.querySelector(arguments[0] + ' .value'); return value ? value.textContent : ''";
    let value = page.script(script, &[json!(cell(feeder, column))]).await?;
    Ok(value.as_str().unwrap_or_default().to_owned())
}

/// The tags of the feeders from top to bottom.
pub async fn tags(page: &Page) -> Outcome<Vec<String>> {
    page.texts("#feeder-grid tbody th .value").await
}

/// What the totals say, one line each.
pub async fn totals(page: &Page) -> Outcome<Vec<String>> {
    let lines = page.texts(".totals tbody tr").await?;
    Ok(lines
        .iter()
        .map(|line| line.split_whitespace().collect::<Vec<_>>().join(" "))
        .collect())
}

/// Each total by its name, with its value for what runs together.
pub async fn total_values(page: &Page) -> Outcome<Vec<(String, String)>> {
    let script = "return [...document.querySelectorAll('.totals tbody tr')].map(row => {
        const value = [...row.querySelector('.figure').childNodes].find(node => node.nodeType === Node.TEXT_NODE);
        return [row.querySelector('th').firstChild.textContent.trim(), value.textContent];
    })";
    Ok(serde_json::from_value(page.script(script, &[]).await?)?)
}

/// The id of what has the focus.
pub async fn focus(page: &Page) -> Outcome<String> {
    let id = page.script("return document.activeElement.id", &[]).await?;
    Ok(id.as_str().unwrap_or_default().to_owned())
}

/// Waits until the focus is somewhere.
pub async fn wait_for_focus(page: &Page, id: &str) -> Outcome {
    page.wait_until(&format!("the focus is on {id}"), async || {
        Ok(focus(page).await? == id)
    })
    .await
}

/// What the page said aloud last.
pub async fn said(page: &Page) -> Outcome<String> {
    let text = page
        .script("return document.getElementById('aloud').textContent", &[])
        .await?;
    Ok(text.as_str().unwrap_or_default().to_owned())
}

/// Types a feeder into the row with the cursor on its tag: tag, load, motor power, drive input, length behind.
pub async fn type_feeder(page: &Page, feeder: [&str; 5]) -> Outcome {
    let [tag, load, power, input, length] = feeder;
    page.press(tag).await?;
    page.press(Key::Tab).await?;
    page.press(load).await?;
    page.press(Key::Tab).await?;
    // Duty stays as it is assumed.
    page.press(Key::Right).await?;
    page.press(power).await?;
    page.press(Key::Tab).await?;
    // The motor current follows from the table.
    page.press(Key::Right).await?;
    page.press(input).await?;
    page.press(Key::Tab).await?;
    for _ in column::DRIVE_INPUT + 1..column::RUN_BEHIND {
        page.press(Key::Right).await?;
    }
    page.press(length).await?;
    page.press(Key::Enter).await
}
