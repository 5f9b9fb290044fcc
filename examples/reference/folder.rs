//! All files of a folder, judged before anything is said.

use super::rows::{Row, read};
use super::verdict::{Tally, Verdict, failure_in_full, judge};
use std::fs;
use std::path::PathBuf;

/// The rows of every `.csv` file which lies in `tests/<folder>` itself, with the name of their file.
///
/// Stops at a file which cannot be read: what a row must have is not a matter of the core.
#[track_caller]
pub fn rows_of(folder: &str) -> Vec<(String, Row)> {
    let path = PathBuf::from(env!("CARGO_MANIFEST_DIR"))
        .join("tests")
        .join(folder);
    let listed = fs::read_dir(&path).unwrap_or_else(|error| panic!("{}: {error}", path.display()));
    let mut files: Vec<PathBuf> = listed
        .map(|entry| match entry {
            Ok(entry) => entry.path(),
            Err(error) => panic!("{}: {error}", path.display()),
        })
        .filter(|file| file.extension().is_some_and(|extension| extension == "csv"))
        .collect();
    files.sort();
    let mut rows = Vec::new();
    for file in files {
        let text =
            fs::read_to_string(&file).unwrap_or_else(|error| panic!("{}: {error}", file.display()));
        let name = file
            .file_name()
            .unwrap_or_default()
            .to_string_lossy()
            .into_owned();
        match read(&text) {
            Ok(of_file) => rows.extend(of_file.into_iter().map(|row| (name.clone(), row))),
            Err(unreadable) => panic!("{name}: {unreadable}"),
        }
    }
    rows
}

/// Judges every row of `tests/<folder>`, prints the worst error of each topic, and stops at the end if any row failed.
#[track_caller]
pub fn check(folder: &str) {
    let mut tally = Tally::default();
    let mut failures = Vec::new();
    for (file, row) in rows_of(folder) {
        let verdict = judge(&row);
        tally.count(&row, &verdict);
        if let Verdict::Failed(troubles) = &verdict {
            failures.push(format!("{file}: {}", failure_in_full(&row, troubles)));
        }
    }
    for line in tally.worst_errors() {
        println!("{line}");
    }
    println!("tests/{folder}: {tally}");
    assert!(failures.is_empty(), "{}\n{tally}", failures.join("\n"));
    assert!(
        tally.passed > 0,
        "tests/{folder} has no row which the core works"
    );
}
