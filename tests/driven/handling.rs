//! The harness itself, tried on a small page made for it: a test that cannot fail proves nothing.

use std::fs;

use serde_json::json;

use crate::harness::{Key, Outcome, Page, Paper, Preference, drive};

const TRIAL: &str = "<!doctype html><html lang=en><link rel=icon href=data:,><title>Trial</title><h1>Trial</h1>
    <label>Name <input id=name></label> <input id=file type=file aria-label=File>
    <p id=seen></p> <ul><li>one<li>two</ul> <p id=hidden hidden>not seen</p>
    <script>
    const seen = text => document.getElementById('seen').textContent = text;
    document.getElementById('name').addEventListener('change', event => seen('changed to ' + event.target.value));
    document.addEventListener('paste', event => seen('pasted ' + event.clipboardData.getData('text/plain')));
    document.getElementById('file').addEventListener('change', async event => seen('file ' + await event.target.files[0].text()));
    </script>";

#[test]
fn page_is_read_and_typed_into() -> Outcome {
    drive(async |page| {
        page.open_other(TRIAL).await?;
        assert_eq!(page.texts("li").await?, ["one", "two"]);
        assert_eq!(page.find_all("li").await?.len(), 2);
        assert!(
            page.is_shown("h1").await?
                && !page.is_shown("#hidden").await?
                && !page.is_shown("#none").await?
        );
        page.enter("#name", "first").await?;
        page.enter("#name", "pump 7").await?;
        page.wait_for_text("#seen", "changed to pump 7").await?;
        assert_eq!(page.text("#name").await?, "pump 7");
        page.click("#name").await?;
        page.press(Key::Control + "a").await?;
        page.press(Key::Delete).await?;
        page.press("fan").await?;
        assert_eq!(page.text("#name").await?, "fan");
        page.paste("30 hp").await?;
        page.wait_for_text("#seen", "pasted 30 hp").await?;
        page.driver().active_element().await?;
        Ok(())
    })
}

#[test]
fn page_is_given_files() -> Outcome {
    drive(async |page| {
        page.open_other(TRIAL).await?;
        page.upload_text("#file", "sheet.json", "made for the test")
            .await?;
        page.wait_for_text("#seen", "file made for the test")
            .await?;
        page.upload(
            "#file",
            concat!(env!("CARGO_MANIFEST_DIR"), "/LICENSE").as_ref(),
        )
        .await?;
        page.wait_for_text("#seen", "file MIT License").await
    })
}

#[test]
fn print_has_the_asked_paper_and_a_readable_text() -> Outcome {
    drive(async |page| {
        page.open_other(
            "<!doctype html><link rel=icon href=data:,><title>Two pages</title><p>first<p style='break-before:page'>second",
        )
        .await?;
        let print = page.print(Paper::A4, "trial-a4").await?;
        assert_eq!(print.pages.len(), 2);
        assert!(
            print.pages.concat().contains("first") && print.text().ends_with("second\n"),
            "{:?}",
            print.pages
        );
        let letter = page.print(Paper::Letter, "trial-letter").await?;
        let size = |file| fs::read(file).map(|bytes| String::from_utf8_lossy(&bytes).into_owned());
        assert!(size(&print.file)?.contains("/MediaBox [0 0 595"));
        assert!(size(&letter.file)?.contains("/MediaBox [0 0 612 792]"));
        assert!(print.pictures()?.with_file_name("trial-a4-1.png").is_file());
        assert!(page.picture("trial").await?.is_file());
        Ok(())
    })
}

#[test]
fn store_outlives_the_browser_but_not_the_scenario() -> Outcome {
    drive(async |page| {
        page.open().await?;
        assert_eq!(page.stored("trial").await?, None);
        page.script("localStorage.setItem('trial', 'kept')", &[])
            .await?;
        page.reload().await?;
        assert_eq!(page.stored("trial").await?.as_deref(), Some("kept"));
        page.reopen_browser().await?;
        page.open().await?;
        assert_eq!(page.stored("trial").await?.as_deref(), Some("kept"));
        Ok(())
    })
}

#[test]
fn network_goes_and_comes_back() -> Outcome {
    drive(async |page| {
        page.open_other(TRIAL).await?;
        page.expect_complaint("Failed to load resource");
        page.go_offline().await?;
        assert_eq!(fetched(page).await?, json!("refused"));
        page.go_online().await?;
        assert_eq!(fetched(page).await?, json!("given"));
        page.stop_server();
        assert_eq!(fetched(page).await?, json!("refused"));
        Ok(())
    })
}

async fn fetched(page: &Page) -> Outcome<serde_json::Value> {
    let script = "const done = arguments[arguments.length - 1];
        fetch('/other', { cache: 'no-store' }).then(() => done('given'), () => done('refused'));";
    page.slow_script(script, &[]).await
}

#[test]
fn person_and_machine_can_be_of_another_kind() -> Outcome {
    drive(async |page| {
        page.without_file_pickers().await?;
        page.open_other(TRIAL).await?;
        let holds = async |page: &Page, expression: &str| -> Outcome<bool> {
            Ok(page.script(&format!("return {expression}"), &[]).await? == json!(true))
        };
        assert!(holds(page, "!('showSaveFilePicker' in window)").await?);
        page.prefer(Preference::Dark).await?;
        assert!(holds(page, "matchMedia('(prefers-color-scheme: dark)').matches").await?);
        page.prefer(Preference::Light).await?;
        assert!(holds(page, "matchMedia('(prefers-color-scheme: light)').matches").await?);
        page.prefer(Preference::ForcedColors).await?;
        assert!(holds(page, "matchMedia('(forced-colors: active)').matches").await?);
        page.resize(320, 640).await?;
        assert!(holds(page, "innerWidth === 320").await?);
        page.slow_down(2).await
    })
}

#[test]
fn complaint_and_strange_request_are_seen() -> Outcome {
    drive(async |page| {
        page.expect_complaint("on purpose");
        page.expect_complaint("/strange");
        page.open_other(
            "<!doctype html><link rel=icon href=data:,><script>console.error('on purpose'); fetch('/strange')</script>",
        )
        .await?;
        page.wait_until("the request is out", async || {
            Ok(page.requests().contains(&"GET /strange".to_owned()))
        })
        .await?;
        assert!(
            page.asked_for()
                .await?
                .iter()
                .any(|address| address.ends_with("/strange"))
        );
        assert!(
            page.log()
                .await?
                .iter()
                .any(|line| line.starts_with("SEVERE") && line.contains("on purpose"))
        );
        Ok(())
    })
}

#[test]
fn page_that_shuts_people_out_is_found_out() -> Outcome {
    drive(async |page| {
        page.open_other(TRIAL).await?;
        assert_eq!(page.accessibility_faults().await?, Vec::<String>::new());
        page.open_other("<!doctype html><link rel=icon href=data:,><title>Bad</title><input>")
            .await?;
        let faults = page.accessibility_faults().await?;
        assert!(
            faults.iter().any(|fault| fault.starts_with("label:")),
            "{faults:?}"
        );
        Ok(())
    })
}
