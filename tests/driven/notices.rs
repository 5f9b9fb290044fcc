//! The notices that stand in the page itself and work without the program.

use serde_json::json;

use crate::harness::{Outcome, drive};
use crate::sheet::{KEPT, open_demo};

#[test]
fn notices_are_hidden_while_all_is_well() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.find("#app > *").await?;
        assert!(!page.is_shown("#broken-notice").await?);
        assert!(!page.is_shown("#start-notice").await?);
        Ok(())
    })
}

#[test]
fn stopped_page_hands_out_the_stored_sheet() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.script(
            "localStorage.setItem('kept', arguments[0]);
             document.getElementById('broken-save').setAttribute('data-key', 'kept');
             document.getElementById('broken-save').setAttribute('data-name', 'rescued.json');
             document.getElementById('broken-notice').hidden = false;",
            &[json!("{\"format\":1,\"title\":\"Süd – ½\"}")],
        )
        .await?;
        page.wait_until("the focus is on the one thing to do", async || {
            Ok(page.script("return document.activeElement.id", &[]).await? == json!("broken-save"))
        })
        .await?;
        page.click("#broken-save").await?;
        assert_eq!(
            page.wait_for_download("rescued.json").await?,
            "{\"format\":1,\"title\":\"Süd – ½\"}"
        );
        assert!(
            page.text("#broken-version")
                .await?
                .starts_with(env!("CARGO_PKG_VERSION"))
        );
        Ok(())
    })
}

#[test]
fn stopped_page_says_when_there_is_no_stored_sheet() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.script(
            "document.getElementById('broken-save').setAttribute('data-key', 'never stored');
             document.getElementById('broken-notice').hidden = false;",
            &[],
        )
        .await?;
        page.click("#broken-save").await?;
        page.wait_for_text("#broken-saved", "no copy").await
    })
}

#[test]
fn fault_that_no_hook_reports_hands_out_the_stored_sheet_too() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        let kept = page.stored(KEPT).await?;
        page.expect_complaint("unreachable");
        // The smallest program that traps: one function whose body is `unreachable`, exported as `f`.
        page.script(
            "const trap = new Uint8Array([0,97,115,109,1,0,0,0,1,4,1,96,0,0,3,2,1,0,7,5,1,1,102,0,0,10,5,1,3,0,0,11]);
             const program = new WebAssembly.Instance(new WebAssembly.Module(trap));
             setTimeout(program.exports.f, 0);",
            &[],
        )
        .await?;
        page.wait_for_text("#broken-message", "unreachable").await?;
        page.click("#broken-save").await?;
        let saved = page.wait_for_download("ventrail-sheet.json").await?;
        assert_eq!(Some(saved), kept);
        assert_eq!(page.stored("ventrail/1/stops").await?.as_deref(), Some("1"));
        Ok(())
    })
}

#[test]
fn panic_of_the_program_hands_out_the_stored_sheet() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        open_demo(page).await?;
        let kept = page.stored(KEPT).await?;
        page.expect_complaint("unreachable");
        // A browser which copies no nodes any more: drawing the next part of the page panics.
        page.script(
            "Node.prototype.cloneNode = () => { throw new Error('no copies'); };
             document.getElementById('add-feeder').click();",
            &[],
        )
        .await?;
        page.wait_for_text("#broken-message", "panicked").await?;
        page.click("#broken-save").await?;
        let saved = page.wait_for_download("ventrail-sheet.json").await?;
        assert!(kept.is_some_and(|kept| saved.len() >= kept.len()));
        assert_eq!(page.stored("ventrail/1/stops").await?.as_deref(), Some("1"));
        Ok(())
    })
}

#[test]
fn browser_without_web_assembly_is_told_so() -> Outcome {
    drive(async |page| {
        page.before_load("delete window.WebAssembly").await?;
        page.open().await?;
        page.wait_for_text("#start-notice", "does not offer WebAssembly")
            .await
    })
}

#[test]
fn program_that_does_not_start_gives_its_reason() -> Outcome {
    drive(async |page| {
        page.before_load("WebAssembly.instantiate = () => Promise.reject(new Error('too old'))")
            .await?;
        page.open().await?;
        page.wait_for_text("#start-message", "too old").await
    })
}

#[test]
fn page_without_scripts_says_what_it_needs() -> Outcome {
    drive(async |page| {
        page.devtools(
            "Emulation.setScriptExecutionDisabled",
            json!({ "value": true }),
        )
        .await?;
        page.open().await?;
        assert!(
            page.find("noscript p")
                .await?
                .text()
                .await?
                .contains("needs scripts")
        );
        Ok(())
    })
}
