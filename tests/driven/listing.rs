//! The feeder list by keyboard alone: building it, walking it, editing it, and taking edits back.

use serde_json::json;

use crate::harness::{Key, Outcome, Page, drive};
use crate::sheet::{
    cell, column, focus, open_demo, said, tags, totals, type_feeder, value, wait_for_focus,
};

#[test]
fn list_is_built_by_keyboard_and_found_again() -> Outcome {
    drive(async |page| {
        page.open().await?;
        // Without a mouse: Tab reaches the conditions, Enter opens them, Escape closes them.
        page.find("#fill-in-supply").await?;
        tab_to(page, "fill-in-supply").await?;
        page.press(Key::Enter).await?;
        wait_for_focus(page, "field-supply_voltage").await?;
        page.press("480").await?;
        page.press(Key::Tab).await?;
        page.press(Key::Tab).await?;
        wait_for_focus(page, "field-transformer_power").await?;
        page.press("500").await?;
        page.press(Key::Tab).await?;
        page.press(Key::Escape).await?;
        wait_for_focus(page, "fill-in-supply").await?;

        tab_to(page, "add-feeder").await?;
        page.press(Key::Enter).await?;
        wait_for_focus(page, "cell-0-0").await?;
        type_feeder(page, ["P-1", "Brine pump", "40", "53.5", "165"]).await?;
        page.press(Key::Control + Key::Enter).await?;
        wait_for_focus(page, "cell-1-0").await?;
        type_feeder(page, ["P-2", "Wash pump", "7,5 kW", "15", "90"]).await?;

        assert_eq!(tags(page).await?, ["P-1", "P-2"]);
        // NEC Table 430.250: 40 hp at 460 V takes 52 A.
        assert_eq!(value(page, 0, column::MOTOR_CURRENT).await?, "52");
        assert_eq!(value(page, 0, column::CONDUCTORS_AHEAD).await?, "4 AWG Cu");
        assert_eq!(value(page, 0, column::RATING).await?, "100");
        let before = totals(page).await?;
        assert!(before[0].starts_with("Heat inside"), "{before:?}");
        assert!(
            before.iter().any(|line| line.contains("68.5 A")),
            "{before:?}"
        );

        page.reload().await?;
        page.find(&cell(1, 0)).await?;
        assert_eq!(tags(page).await?, ["P-1", "P-2"]);
        assert_eq!(totals(page).await?, before);
        page.wait_for_text(".kept", "Not yet in a file").await
    })
}

/// Presses Tab until the focus is on what has this id.
async fn tab_to(page: &Page, id: &str) -> Outcome {
    let mut passed = Vec::new();
    while focus(page).await? != id {
        assert!(passed.len() < 60, "Tab does not reach {id}, but {passed:?}");
        page.press(Key::Tab).await?;
        passed.push(focus(page).await?);
    }
    Ok(())
}

#[test]
fn arrows_and_ends_walk_the_list() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(0, column::LOAD)).await?;
        let at = async |keys: &[Key], id: &str| -> Outcome {
            for key in keys {
                page.press(key.clone()).await?;
            }
            assert_eq!(focus(page).await?, id, "after {keys:?}");
            Ok(())
        };
        at(&[Key::Down], "cell-1-1").await?;
        at(&[Key::Right, Key::Right], "cell-1-3").await?;
        at(&[Key::Up, Key::Left], "cell-0-2").await?;
        at(&[Key::Up], "cell-0-2").await?;
        at(&[Key::Home], "cell-0-0").await?;
        at(&[Key::Left], "cell-0-0").await?;
        at(&[Key::End, Key::Right], &format!("cell-0-{}", column::LAST)).await?;
        at(&[Key::PageDown], &format!("cell-10-{}", column::LAST)).await?;
        at(&[Key::PageUp], &format!("cell-0-{}", column::LAST)).await?;
        page.press(Key::Control + Key::Home).await?;
        assert_eq!(focus(page).await?, "cell-0-0");
        page.press(Key::Control + Key::End).await?;
        assert_eq!(focus(page).await?, format!("cell-10-{}", column::LAST));
        // One Tab leaves the list, and one comes back to where the cursor was.
        page.press(Key::Tab).await?;
        assert!(!focus(page).await?.starts_with("cell-"));
        page.press(Key::Shift + Key::Tab).await?;
        assert_eq!(focus(page).await?, format!("cell-10-{}", column::LAST));
        Ok(())
    })
}

#[test]
fn cell_is_edited_replaced_given_up_and_emptied() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(0, column::DRIVE_INPUT)).await?;
        // Enter and F2 edit the old text; Escape gives the edit up.
        page.press(Key::Enter).await?;
        wait_for_focus(page, "cell-editor").await?;
        assert_eq!(page.text("#cell-editor").await?, "53.5");
        page.press("99").await?;
        page.press(Key::Escape).await?;
        assert_eq!(focus(page).await?, "cell-0-5");
        assert_eq!(value(page, 0, column::DRIVE_INPUT).await?, "53.5");
        page.press(Key::F2).await?;
        wait_for_focus(page, "cell-editor").await?;
        page.press(Key::Escape).await?;
        // Typing replaces; Enter takes it and goes down, Tab takes it and goes on.
        page.press("61").await?;
        page.press(Key::Enter).await?;
        assert_eq!(value(page, 0, column::DRIVE_INPUT).await?, "61");
        assert_eq!(focus(page).await?, "cell-1-5");
        page.press("62 A").await?;
        page.press(Key::Tab).await?;
        assert_eq!(value(page, 1, column::DRIVE_INPUT).await?, "62");
        assert_eq!(focus(page).await?, "cell-1-6");
        // A list opens with Enter, and is answered with the arrows or by typing.
        page.press("inv").await?;
        page.press(Key::Enter).await?;
        assert_eq!(value(page, 1, 6).await?, "inverse time breaker");
        page.click(&cell(1, column::DUTY)).await?;
        page.press(Key::Enter).await?;
        wait_for_focus(page, "cell-editor").await?;
        page.press(Key::Up).await?;
        page.press(Key::Enter).await?;
        assert_eq!(value(page, 1, column::DUTY).await?, "runs together");
        // Delete empties, and what is assumed takes its place.
        page.click(&cell(1, column::DRIVE_INPUT)).await?;
        page.press(Key::Delete).await?;
        assert_ne!(value(page, 1, column::DRIVE_INPUT).await?, "62");
        assert!(
            page.find(&format!("{}.assumed", cell(1, column::DRIVE_INPUT)))
                .await
                .is_ok()
        );
        // A click goes to a cell, and one more edits it.
        page.click(&cell(2, column::LOAD)).await?;
        assert_eq!(page.find_all("#cell-editor").await?.len(), 0);
        page.click(&cell(2, column::LOAD)).await?;
        wait_for_focus(page, "cell-editor").await?;
        page.press(Key::Escape).await?;
        // Worked cells take nothing.
        page.click(&cell(1, column::HEAT)).await?;
        page.press("5").await?;
        assert_eq!(focus(page).await?, format!("cell-1-{}", column::HEAT));
        assert_eq!(page.find_all("#cell-editor").await?.len(), 0);
        Ok(())
    })
}

#[test]
fn edits_are_taken_back_and_done_again() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(0, column::MOTOR_POWER)).await?;
        page.press("50").await?;
        page.press(Key::Enter).await?;
        page.wait_for_text("#undo", "motor power of P-101").await?;
        page.press(Key::Control + "z").await?;
        assert_eq!(value(page, 0, column::MOTOR_POWER).await?, "40");
        assert_eq!(said(page).await?, "Undone: motor power of P-101");
        page.press(Key::Control + "y").await?;
        assert_eq!(value(page, 0, column::MOTOR_POWER).await?, "50");
        page.press(Key::Control + "z").await?;
        // The step before that is the demo itself.
        page.press(Key::Control + "z").await?;
        page.find("#welcome").await?;
        page.click("#redo").await?;
        page.find(&cell(10, 0)).await?;
        assert_eq!(tags(page).await?.len(), 11);
        Ok(())
    })
}

#[test]
fn feeders_are_added_copied_moved_and_deleted_and_the_focus_stays() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(1, column::TAG)).await?;
        page.press(Key::Alt + Key::Up).await?;
        assert_eq!(focus(page).await?, "cell-1-0");
        assert_eq!(said(page).await?, "P-102 is in row 1 now");
        assert_eq!(tags(page).await?[..2], ["P-102", "P-101"]);
        page.press(Key::Alt + Key::Down).await?;
        assert_eq!(tags(page).await?[..2], ["P-101", "P-102"]);
        page.click("#duplicate-feeder").await?;
        page.wait_until("there are twelve feeders", async || {
            Ok(tags(page).await?.len() == 12)
        })
        .await?;
        let copy = focus(page).await?;
        assert!(copy.starts_with("cell-") && copy.ends_with("-0"), "{copy}");
        page.press("P-102 B").await?;
        page.press(Key::Enter).await?;
        assert_eq!(tags(page).await?[2], "P-102 B");
        page.press(Key::Up).await?;
        page.press(Key::Control + Key::Delete).await?;
        assert_eq!(said(page).await?, "P-102 B deleted; undo brings it back");
        assert_eq!(tags(page).await?.len(), 11);
        assert_eq!(focus(page).await?, "cell-2-0");
        // The first and the last stay where they are.
        page.press(Key::Control + Key::Home).await?;
        page.press(Key::Alt + Key::Up).await?;
        assert_eq!(tags(page).await?[0], "P-101");
        assert_eq!(focus(page).await?, "cell-0-0");
        Ok(())
    })
}

#[test]
fn feeder_opens_as_a_form_and_closes_again() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(3, column::LOAD)).await?;
        page.press(Key::Alt + Key::Enter).await?;
        wait_for_focus(page, "field-3-tag").await?;
        page.enter("#field-3-drive_input", "25").await?;
        assert_eq!(value(page, 3, column::DRIVE_INPUT).await?, "25");
        // A refusal has its reason beside the field, and what held before still counts.
        page.enter("#field-3-drive_loss", "much").await?;
        page.wait_for_text("#field-3-drive_loss-about", "is not a number")
            .await?;
        page.wait_for_text("#field-3-drive_loss-about", "still counts")
            .await?;
        let invalid = page
            .script(
                "return document.getElementById('field-3-drive_loss').getAttribute('aria-invalid')",
                &[],
            )
            .await?;
        assert_eq!(invalid, json!("true"));
        page.press(Key::Escape).await?;
        wait_for_focus(page, "cell-3-1").await?;
        assert_eq!(page.find_all("#feeder-form").await?.len(), 0);
        Ok(())
    })
}
