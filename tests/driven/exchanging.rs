//! Sheets in files: saved, opened again, and refused where they are damaged.

use serde_json::json;

use crate::harness::{Key, Outcome, drive};
use crate::sheet::{KEPT, cell, column, focus, open_demo, tags, totals, value};

const INPUT: &str = "#file-input";

#[test]
fn saved_file_opens_as_the_same_sheet() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("Südpumpe – ½").await?;
        page.press(Key::Enter).await?;
        let before = totals(page).await?;
        page.press(Key::Control + "s").await?;
        let name = "brine-hall-pump-and-conveyor-panel-b-for-review.json";
        let text = page.wait_for_download(name).await?;
        page.wait_for_text(".kept", &format!("In the file {name}"))
            .await?;
        assert_eq!(page.stored(KEPT).await?.as_deref(), Some(text.as_str()));

        page.click("#new-sheet").await?;
        page.find("#welcome").await?;
        page.upload_text(INPUT, "again.json", &text).await?;
        page.find(&cell(0, column::LOAD)).await?;
        assert_eq!(value(page, 0, column::LOAD).await?, "Südpumpe – ½");
        assert_eq!(totals(page).await?, before);
        page.wait_for_text(".kept", "In the file again.json")
            .await?;
        // Whether it is still the same as in the file is known after a reload, too.
        page.reload().await?;
        page.wait_for_text(".kept", "In the file again.json")
            .await?;
        page.click(&cell(0, column::MOTOR_POWER)).await?;
        page.press("30").await?;
        page.press(Key::Enter).await?;
        page.wait_for_text(".kept", "Changed since it was saved as again.json")
            .await?;
        page.reload().await?;
        page.wait_for_text(".kept", "Changed since it was saved as again.json")
            .await
    })
}

#[test]
fn damaged_file_is_refused_and_the_sheet_stays() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        let before = (
            tags(page).await?,
            totals(page).await?,
            page.stored(KEPT).await?,
        );
        let refusals = [
            ("cut.json", "{\"format\": 1, \"program\": \"ventr", "line 1"),
            (
                "other.json",
                "{\"name\": \"not one of ours\"}",
                "no sheet of this program",
            ),
            (
                "later.json",
                "{\"format\": 99, \"program\": \"ventrail\"}",
                "later version",
            ),
            (
                "impossible.json",
                "{\"format\": 1, \"program\": \"ventrail\", \"next_id\": 1, \"sheet\": {\"supply_voltage\": {\"number\": 480.0, \"unit\": \"kg\", \"text\": \"480\"}}, \"feeders\": [], \"sources\": []}",
                "sheet.supply_voltage",
            ),
        ];
        for (name, text, why) in refusals {
            page.upload_text(INPUT, name, text).await?;
            page.wait_for_text("#message", name).await?;
            page.wait_for_text("#message", why).await?;
            page.wait_for_text("#message", "is unchanged").await?;
            let now = (
                tags(page).await?,
                totals(page).await?,
                page.stored(KEPT).await?,
            );
            assert_eq!(now, before, "after {name}");
        }
        page.click("#message button").await?;
        assert_eq!(page.find_all("#message").await?.len(), 0);
        assert_eq!(focus(page).await?, "open-file");
        Ok(())
    })
}

#[test]
fn opening_and_starting_anew_can_be_taken_back() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        let before = tags(page).await?;
        page.click("#new-sheet").await?;
        page.find("#welcome").await?;
        page.click("#undo").await?;
        page.find(&cell(0, 0)).await?;
        assert_eq!(tags(page).await?, before);
        Ok(())
    })
}

#[test]
fn browser_with_a_window_for_saving_is_asked_for_a_place() -> Outcome {
    drive(async |page| {
        page.before_load(
            "window.written = '';
             window.showSaveFilePicker = async wanted => {
                 window.wanted = JSON.stringify(wanted);
                 return { name: 'chosen.json', createWritable: async () => ({
                     write: async text => { window.written += text; }, close: async () => {} }) };
             };",
        )
        .await?;
        open_demo(page).await?;
        page.click("#save-file").await?;
        page.wait_for_text(".kept", "In the file chosen.json")
            .await?;
        let wanted = page.script("return window.wanted", &[]).await?;
        let wanted = wanted.as_str().unwrap_or_default();
        assert!(
            wanted.contains("\"suggestedName\":\"brine-hall")
                && wanted.contains("\"application/json\":[\".json\"]"),
            "{wanted}"
        );
        let written = page.script("return window.written", &[]).await?;
        assert_eq!(written.as_str(), page.stored(KEPT).await?.as_deref());
        // A window which is closed without a choice changes nothing, and is no fault.
        page.script(
            "window.showSaveFilePicker = async () => { window.asked = true; throw new DOMException('closed', 'AbortError'); }",
            &[],
        )
        .await?;
        page.click("#save-file").await?;
        page.wait_until("the window was asked for", async || {
            Ok(page.script("return window.asked === true", &[]).await? == json!(true))
        })
        .await?;
        assert_eq!(page.find_all("#message").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn replaced_sheet_which_is_in_no_file_is_offered_again() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        // A demo as it came is no loss.
        page.click("#new-sheet").await?;
        page.reload().await?;
        page.find("#welcome").await?;
        assert_eq!(page.find_all("#rescued").await?.len(), 0);

        page.click("#demo-sheet").await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("Work of a day").await?;
        page.press(Key::Enter).await?;
        page.click("#new-sheet").await?;
        page.reload().await?;
        page.wait_for_text("#rescued", "in no file").await?;
        page.click("#save-rescued").await?;
        let text = page.wait_for_download("ventrail-rescued.json").await?;
        assert!(text.contains("Work of a day"));
        page.click("#drop-rescued").await?;
        assert_eq!(page.find_all("#rescued").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn text_still_being_typed_is_in_the_saved_file() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("Not yet left").await?;
        page.press(Key::Control + "s").await?;
        let name = "brine-hall-pump-and-conveyor-panel-b-for-review.json";
        assert!(page.wait_for_download(name).await?.contains("Not yet left"));
        assert_eq!(focus(page).await?, "cell-0-1");
        Ok(())
    })
}
