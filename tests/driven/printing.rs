//! The printed summary on both papers: everything is in it, and its head is on each page.

use crate::harness::{Key, Outcome, Paper, drive};
use crate::sheet::{cell, column, open_demo, tags, total_values};

#[test]
fn summary_holds_feeders_heat_airflow_notes_and_cautions() -> Outcome {
    drive(async |page| {
        open_demo(page).await?;
        page.click(&cell(0, column::LOAD)).await?;
        page.press("Pump of this print").await?;
        page.press(Key::Enter).await?;
        let tags = tags(page).await?;
        assert_eq!(tags.len(), 11);
        let totals = total_values(page).await?;
        assert_eq!(totals.len(), 6);
        for (paper, name) in [(Paper::A4, "summary-a4"), (Paper::Letter, "summary-letter")] {
            let print = page.print(paper, name).await?;
            let text = print.text();
            let words: String = text.split_whitespace().collect::<Vec<_>>().join(" ");
            for tag in &tags {
                assert!(
                    words.contains(tag.as_str()),
                    "{tag} is missing on {paper:?}"
                );
            }
            // The total heat, the airflow and their like.
            for (total, value) in &totals {
                let line = format!("{total} {value}");
                assert!(words.contains(&line), "{line} is missing on {paper:?}");
            }
            for part in [
                "Pump of this print",
                "The local code decides",
                "A licensed engineer must review this sheet",
                "Drive capacitors stay charged",
                "prove it dead",
                "The makers' instructions govern",
                "Fault current and arc flash need their own study",
                "Confirm what is assumed",
                "Compared with our copy of 2022",
                "Assumed until somebody types it",
                "Airflow, no credit for the walls",
                "430.122(A)",
                // Steps behind a choice and behind a table.
                "310.15(B)",
                "250.122(B)",
                // What was entered and stands in no table.
                "Shares its raceway with P-111.",
                "Warmest air at full drive current: 122 °F",
                "Signature",
                "End of the summary",
            ] {
                assert!(words.contains(part), "\"{part}\" is missing on {paper:?}");
            }
            for (number, text) in print.pages.iter().enumerate() {
                let head = text
                    .lines()
                    .find(|line| !line.trim().is_empty())
                    .unwrap_or_default();
                assert!(
                    head.contains(
                        "Brine hall, pump and conveyor panel, issue B, for review, 9 May 2025"
                    ) && head.contains(env!("CARGO_PKG_VERSION")),
                    "page {number} on {paper:?} begins with {head:?}"
                );
                let of = format!("{} / {}", number + 1, print.pages.len());
                assert!(text.contains(&of), "page {number} does not say {of}");
            }
            // Nothing that is for the screen alone.
            for part in ["Add feeder", "Fill in", "Whole chain"] {
                assert!(!words.contains(part), "\"{part}\" is printed");
            }
        }
        // The page is as it was.
        assert!(page.is_shown("#feeder-grid").await?);
        assert_eq!(page.find_all("#paper > *").await?.len(), 0);
        assert!(
            page.title()
                .await?
                .starts_with("Brine hall, pump and conveyor panel")
        );
        Ok(())
    })
}

#[test]
fn empty_sheet_prints_too() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.find("#welcome").await?;
        let print = page.print(Paper::A4, "empty-a4").await?;
        let text = print.text();
        assert!(text.contains("Panel heat and protection summary"));
        assert!(text.contains("The local code decides"));
        Ok(())
    })
}
