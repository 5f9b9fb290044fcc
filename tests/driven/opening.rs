//! The page opens, from a server and from a disk, and keeps to itself.

use serde_json::json;

use crate::harness::{Outcome, drive};

#[test]
fn page_opens_from_a_server_and_asks_for_nothing_else() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.find("#app > *").await?;
        assert_eq!(page.title().await?, "Ventrail");
        assert_eq!(page.requests(), ["GET /"]);
        Ok(())
    })
}

#[test]
fn page_opens_from_a_disk() -> Outcome {
    drive(async |page| {
        page.open_from_disk().await?;
        page.find("#app > *").await?;
        assert!(page.requests().is_empty());
        Ok(())
    })
}

#[test]
fn policy_forbids_everything_that_is_not_in_the_file() -> Outcome {
    drive(async |page| {
        page.open().await?;
        let policy = page
            .script("return document.querySelector('meta[http-equiv=\"Content-Security-Policy\"]').content", &[])
            .await?;
        let policy = policy.as_str().unwrap_or_default();
        for rule in [
            "default-src 'none'",
            "connect-src 'none'",
            "form-action 'none'",
            "base-uri 'none'",
        ] {
            assert!(policy.contains(rule), "{rule} is missing from {policy}");
        }
        assert!(
            !policy.contains("unsafe-inline") && !policy.contains("'unsafe-eval'"),
            "{policy}"
        );
        Ok(())
    })
}

#[test]
fn page_can_send_nothing_anywhere() -> Outcome {
    drive(async |page| {
        page.open().await?;
        page.expect_complaint("Content Security Policy");
        let refused = page
            .slow_script(
                "const done = arguments[arguments.length - 1];
                 document.addEventListener('securitypolicyviolation', event => done(event.effectiveDirective));
                 fetch('/x').then(() => done('it was sent'), () => {});",
                &[],
            )
            .await?;
        assert_eq!(refused, json!("connect-src"));
        assert_eq!(page.requests(), ["GET /"]);
        Ok(())
    })
}

#[test]
fn page_names_its_version() -> Outcome {
    drive(async |page| {
        page.open().await?;
        let build = page
            .script(
                "return document.querySelector('meta[name=ventrail-build]').content",
                &[],
            )
            .await?;
        let build = build.as_str().unwrap_or_default();
        assert!(
            build.starts_with(concat!(env!("CARGO_PKG_VERSION"), "+")),
            "{build}"
        );
        Ok(())
    })
}
