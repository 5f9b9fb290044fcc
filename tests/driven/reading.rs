//! Reading the sheet: workings in the strip, margin notes and their answers, units, and work without a network.

use crate::harness::{Key, Outcome, Preference, drive};
use crate::sheet::{KEPT, cell, column, focus, open_demo, totals, value, wait_for_focus};

#[test]
fn working_of_the_figure_under_the_cursor_is_read_and_pinned() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(0, column::CONDUCTORS_AHEAD)).await?;
        page.wait_for_text("#strip .read", "P-101, conductors ahead of the drive")
            .await?;
        page.wait_for_text("#strip .read", "4 AWG").await?;
        // Space unfolds the chain down to what was entered.
        page.press(" ").await?;
        page.wait_for_text("#strip .chain", "NEC 2023, 430.122(A)")
            .await?;
        page.wait_for_text("#strip .chain", "entered: drive rated input current")
            .await?;
        page.press("p").await?;
        page.press(Key::Down).await?;
        page.wait_for_text("#strip .read", "P-101").await?;
        assert_eq!(
            focus(page).await?,
            format!("cell-1-{}", column::CONDUCTORS_AHEAD)
        );
        page.press("p").await?;
        page.wait_for_text("#strip .read", "P-102").await?;
        // Elsewhere the letter does nothing.
        let pinned =
            async || -> Outcome<bool> { Ok(!page.find_all("#strip.pinned").await?.is_empty()) };
        page.click("#toggle-cautions").await?;
        page.press("p").await?;
        assert!(!pinned().await?);
        page.click(".totals tbody tr:first-child .figure").await?;
        page.press("p").await?;
        assert!(pinned().await?);
        page.press("p").await?;
        assert!(!pinned().await?);
        // Totals and the ledger are read the same way.
        page.click(".totals tbody tr:first-child .figure").await?;
        page.wait_for_text("#strip .read", "Heat inside").await?;
        page.click(".ledger .sum .figure").await?;
        page.wait_for_text("#strip .chain", "W").await
    })
}

#[test]
fn notes_lead_to_their_subjects_and_are_answered() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.press(Key::F8).await?;
        let first = focus(page).await?;
        assert!(first.starts_with("note-"), "{first}");
        // Stops come first.
        page.wait_for_text(&format!("#{first} .mark"), "stop")
            .await?;
        page.press(Key::F8).await?;
        let second = focus(page).await?;
        assert_ne!(second, first);
        page.click("[id^=note-feeder-8-reactor_percent] .go-to")
            .await?;
        wait_for_focus(page, "field-8-reactor_percent").await?;
        page.press(Key::Shift + Key::F8).await?;
        page.wait_until("the focus is back in the margin", async || {
            Ok(focus(page).await?.starts_with("note-"))
        })
        .await?;
        // Enter on the marks of a row goes to its first note.
        page.click(&cell(10, column::LAST)).await?;
        page.press(Key::Enter).await?;
        page.wait_until("the focus is on a note of the feeder", async || {
            Ok(focus(page).await?.starts_with("note-feeder-10-"))
        })
        .await?;
        let note = focus(page).await?;
        page.enter(&format!("#{note}-answer"), "Taken up with the maker.")
            .await?;
        assert!(
            page.stored(KEPT)
                .await?
                .is_some_and(|kept| kept.contains("Taken up with the maker."))
        );
        Ok(())
    })
}

#[test]
fn units_are_a_choice_of_the_sheet() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click("#fill-in-title").await?;
        page.find("#field-units").await?;
        page.script(
            "const units = document.getElementById('field-units'); units.value = 'si';
             units.dispatchEvent(new Event('change', { bubbles: true }));",
            &[],
        )
        .await?;
        page.wait_for_text("#feeder-grid thead", "kW").await?;
        assert_eq!(value(page, 0, column::MOTOR_POWER).await?, "29.8");
        page.press(Key::Escape).await?;
        page.wait_for_text("#supply .sentence", "°C").await?;
        // What was typed is not touched by it.
        page.click("#undo").await?;
        page.wait_for_text("#feeder-grid thead", "hp").await?;
        assert_eq!(value(page, 0, column::MOTOR_POWER).await?, "40");
        Ok(())
    })
}

#[test]
fn page_works_on_without_a_network() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.go_offline().await?;
        page.stop_server();
        let before = totals(page).await?;
        page.click(&cell(0, column::DRIVE_INPUT)).await?;
        page.press("70").await?;
        page.press(Key::Enter).await?;
        page.wait_until("the totals are worked again", async || {
            Ok(totals(page).await? != before)
        })
        .await?;
        assert!(
            page.stored(KEPT)
                .await?
                .is_some_and(|kept| kept.contains("\"number\": 70.0"))
        );
        assert_eq!(page.requests(), ["GET /"]);
        Ok(())
    })
}

#[test]
fn nobody_is_shut_out_of_the_page() -> Outcome {
    drive(async |page| {
        for preference in [Preference::Light, Preference::Dark] {
            page.prefer(preference).await?;
            page.open().await?;
            page.find("#add-feeder").await?;
            let mut faults = page.accessibility_faults().await?;
            if page.find_all(".demo").await?.is_empty() {
                page.click("#new-sheet").await?;
            }
            page.click(".demo").await?;
            page.find(&cell(0, 0)).await?;
            faults.extend(page.accessibility_faults().await?);
            page.click(&cell(1, column::MOTOR_POWER)).await?;
            page.press("much").await?;
            page.press(Key::Enter).await?;
            faults.extend(page.accessibility_faults().await?);
            page.press(Key::F2).await?;
            wait_for_focus(page, "cell-editor").await?;
            faults.extend(page.accessibility_faults().await?);
            page.press(Key::Escape).await?;
            page.click("#open-feeder").await?;
            page.find("#feeder-form").await?;
            page.click("#fill-in-enclosure").await?;
            faults.extend(page.accessibility_faults().await?);
            page.click("#keys").await?;
            faults.extend(page.accessibility_faults().await?);
            assert_eq!(faults, Vec::<String>::new(), "with {preference:?}");
        }
        Ok(())
    })
}

#[test]
fn narrow_screen_keeps_the_margin_in_reach() -> Outcome {
    drive(async |page| {
        page.resize(768, 1024).await?;
        open_demo(page).await?;
        assert!(!page.is_shown("#notes-head").await?);
        page.wait_for_text("#toggle-margin", "stop").await?;
        page.click("#toggle-margin").await?;
        assert!(page.is_shown("#notes-head").await?);
        page.click("#toggle-margin").await?;
        page.press(Key::F8).await?;
        assert!(page.is_shown("#notes-head").await?);
        // At 320 pixels nothing but the tables scrolls sideways.
        page.resize(320, 640).await?;
        let too_wide = page
            .script(
                "return document.documentElement.scrollWidth > innerWidth",
                &[],
            )
            .await?;
        assert_eq!(too_wide, serde_json::json!(false));
        Ok(())
    })
}
