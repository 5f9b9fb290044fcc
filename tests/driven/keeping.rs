//! Nothing typed is lost: refused texts, half-typed texts, other tabs, and a store which fails.

use serde_json::json;

use crate::harness::{Key, Outcome, drive};
use crate::sheet::{KEPT, cell, column, open_demo, tags, totals, value};

#[test]
fn refused_text_stays_with_its_reason_and_outlives_a_reload() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        let before = totals(page).await?;
        let place = cell(3, column::DRIVE_INPUT);
        page.click(&place).await?;
        page.press("9 kW").await?;
        page.press(Key::Enter).await?;
        let marked = async || -> Outcome {
            let refused = page
                .find(&format!("{place}.refused[aria-invalid=true]"))
                .await?;
            let reason = refused.attr("aria-describedby").await?.unwrap_or_default();
            let reason = page.find(&format!("#{reason}")).await?;
            assert!(
                reason
                    .prop("textContent")
                    .await?
                    .unwrap_or_default()
                    .contains("measures something else")
            );
            assert_eq!(value(page, 3, column::DRIVE_INPUT).await?, "9 kW");
            Ok(())
        };
        marked().await?;
        // It changes no result, and stands among the notes.
        assert_eq!(totals(page).await?, before);
        page.find("[id^=note-feeder-3-drive_input-draft-refused]")
            .await?;
        page.reload().await?;
        page.find(&place).await?;
        marked().await?;
        // Typed rightly, it is taken.
        page.click(&place).await?;
        page.press(Key::Enter).await?;
        // The control in which it opens again says the same, and of which feeder.
        let editor = page.find("#cell-editor[aria-invalid=true]").await?;
        let reason = editor.attr("aria-describedby").await?.unwrap_or_default();
        let script = "return document.getElementById(arguments[0]).textContent";
        let reason = page.script(script, &[json!(reason)]).await?;
        assert!(reason.to_string().contains("measures something else"));
        let name = editor.attr("aria-label").await?.unwrap_or_default();
        assert!(name.starts_with(&tags(page).await?[3]), "{name}");
        page.press(Key::Control + "a").await?;
        page.press("22").await?;
        page.press(Key::Enter).await?;
        assert_eq!(value(page, 3, column::DRIVE_INPUT).await?, "22");
        assert_eq!(page.find_all("[id*=draft-refused]").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn text_being_typed_outlives_the_tab() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(2, column::LOAD)).await?;
        page.press("Half a na").await?;
        page.wait_until("the text is kept", async || {
            Ok(page
                .stored("ventrail/1/typing")
                .await?
                .is_some_and(|kept| kept.ends_with("Half a na")))
        })
        .await?;
        // As if the tab had died: what the page would do when it is left does not happen.
        page.script(
            "window.addEventListener('blur', event => event.stopImmediatePropagation(), true)",
            &[],
        )
        .await?;
        page.reload().await?;
        page.find(&cell(2, column::LOAD)).await?;
        let load = value(page, 2, column::LOAD).await?;
        assert_eq!(load, "Half a na");
        Ok(())
    })
}

#[test]
fn change_in_another_tab_is_said_and_nothing_is_written_over() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        let first = page.driver().window().await?;
        let second = page.driver().new_tab().await?;
        page.driver().switch_to_window(second.clone()).await?;
        page.open().await?;
        page.find(&cell(0, 0)).await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("From the second tab").await?;
        page.press(Key::Enter).await?;
        let theirs = page.stored(KEPT).await?;

        page.driver().switch_to_window(first.clone()).await?;
        page.find("#other-tab").await?;
        page.click(&cell(0, column::TAG)).await?;
        page.press("P-1 here").await?;
        page.press(Key::Enter).await?;
        assert_eq!(
            page.stored(KEPT).await?,
            theirs,
            "the other tab's sheet was written over"
        );
        page.click("#take-other").await?;
        assert_eq!(value(page, 0, column::LOAD).await?, "From the second tab");
        assert_eq!(page.find_all("#other-tab").await?.len(), 0);
        // Undo brings this tab's own back, and now it is this one that is kept.
        page.click("#undo").await?;
        assert_eq!(tags(page).await?[0], "P-1 here");
        assert!(
            page.stored(KEPT)
                .await?
                .is_some_and(|kept| kept.contains("P-1 here"))
        );

        page.driver().switch_to_window(second).await?;
        page.click("#keep-this").await?;
        assert!(
            page.stored(KEPT)
                .await?
                .is_some_and(|kept| kept.contains("From the second tab"))
        );
        Ok(())
    })
}

#[test]
fn what_a_tab_behind_put_aside_is_offered_after_a_reload() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        let first = page.driver().window().await?;
        let second = page.driver().new_tab().await?;
        page.driver().switch_to_window(second).await?;
        page.open().await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("From the second tab").await?;
        page.press(Key::Enter).await?;

        page.driver().switch_to_window(first).await?;
        page.find("#other-tab").await?;
        page.click(&cell(0, column::TAG)).await?;
        page.press("P-1 here").await?;
        page.press(Key::Enter).await?;
        page.wait_for_text(".kept", "until you choose").await?;
        // A stop now would hand out this tab's own sheet.
        let key = page
            .script(
                "return document.getElementById('broken-save').getAttribute('data-key')",
                &[],
            )
            .await?;
        let aside = page.stored(key.as_str().unwrap_or_default()).await?;
        assert!(aside.is_some_and(|kept| kept.contains("P-1 here")));
        // As if the tab had died, so that nothing asks before it goes.
        page.script(
            "window.addEventListener('beforeunload', event => event.stopImmediatePropagation(), true)",
            &[],
        )
        .await?;
        page.reload().await?;
        assert_eq!(value(page, 0, column::LOAD).await?, "From the second tab");
        page.wait_for_text("#rescued", "beside the other tab's")
            .await?;
        page.click("#save-rescued").await?;
        assert!(
            page.wait_for_download("ventrail-rescued.json")
                .await?
                .contains("P-1 here")
        );
        page.click("#drop-rescued").await?;
        page.reload().await?;
        page.find(&cell(0, 0)).await?;
        assert_eq!(page.find_all("#rescued").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn full_store_is_said_and_the_work_goes_on() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.script(
            "const fill = 'x'.repeat(65536);
             for (let size = fill.length; size > 0;) {
                 try { localStorage.setItem('fill-' + localStorage.length, fill.slice(0, size)); } catch { size >>= 1; }
             }",
            &[],
        )
        .await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press(format!("A longer name {}", "and longer ".repeat(5)))
            .await?;
        page.press(Key::Enter).await?;
        page.wait_for_text("#store-message", "full").await?;
        page.wait_for_text(".kept", "Not kept in this browser")
            .await?;
        page.click(&cell(0, column::MOTOR_POWER)).await?;
        page.press("30").await?;
        page.press(Key::Enter).await?;
        assert_eq!(value(page, 0, column::MOTOR_POWER).await?, "30");
        // Once there is room again, all is kept.
        page.script(
            "for (const key of Object.keys(localStorage)) { if (key.startsWith('fill-')) localStorage.removeItem(key); }",
            &[],
        )
        .await?;
        page.click("#undo").await?;
        page.wait_for_text(".kept", "Saved in this browser").await?;
        assert_eq!(page.find_all("#store-message").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn kept_text_which_cannot_be_read_is_handed_out() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        page.open().await?;
        page.script(
            "localStorage.setItem(arguments[0], '{\"format\": 1, damaged')",
            &[json!(KEPT)],
        )
        .await?;
        page.reload().await?;
        page.wait_for_text("#rescued", "could not be read").await?;
        page.find("#welcome").await?;
        page.click("#save-rescued").await?;
        assert_eq!(
            page.wait_for_download("ventrail-rescued.json").await?,
            "{\"format\": 1, damaged"
        );
        // It is offered until the person is done with it.
        page.reload().await?;
        page.find("#rescued").await?;
        page.click("#drop-rescued").await?;
        page.reload().await?;
        page.find("#welcome").await?;
        assert_eq!(page.find_all("#rescued").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn sheet_on_which_the_program_stopped_twice_is_not_opened_again() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        let kept = page.stored(KEPT).await?;
        page.script("localStorage.setItem('ventrail/1/stops', '2')", &[])
            .await?;
        page.reload().await?;
        page.wait_for_text("#rescued", "stopped twice").await?;
        page.find("#welcome").await?;
        assert_eq!(page.stored("ventrail/1/rescued").await?, kept);
        assert_eq!(page.stored("ventrail/1/stops").await?, None);
        Ok(())
    })
}
