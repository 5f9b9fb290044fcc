//! Compares the core with rows of published and independent values.
//!
//! `cargo run --release --example check_reference -- FILE.csv …` prints one line for each row and last a count of them;
//! `--topics` lists the topics with their keys. Exit status: 0 where nothing failed, 1 where a row failed, 2 where a
//! file could not be read. DEVELOPERS.md describes the columns.

mod reference;

use reference::rows::read;
use reference::topics::listing;
use reference::verdict::{Tally, Verdict, judge};
use std::io::{self, Write};
use std::process::ExitCode;

const ROW_FAILED: u8 = 1;
const UNREADABLE: u8 = 2;

fn main() -> ExitCode {
    let arguments: Vec<String> = std::env::args().skip(1).collect();
    let mut out = io::stdout().lock();
    // A reader of the output who has gone away wants no more of it.
    let done = match arguments.as_slice() {
        [only] if only == "--topics" => out.write_all(listing().as_bytes()).map(|()| 0),
        [] => {
            eprintln!("Give one or more files, or --topics for the topics and keys.");
            Ok(UNREADABLE)
        }
        files => check(files, &mut out),
    };
    ExitCode::from(done.unwrap_or(UNREADABLE))
}

fn check(files: &[String], out: &mut impl Write) -> io::Result<u8> {
    let mut tally = Tally::default();
    for file in files {
        let read = std::fs::read_to_string(file)
            .map_err(|error| error.to_string())
            .and_then(|text| read(&text).map_err(|unreadable| unreadable.to_string()));
        let rows = match read {
            Ok(rows) => rows,
            Err(why) => {
                eprintln!("{file}: {why}");
                return Ok(UNREADABLE);
            }
        };
        for row in rows {
            let verdict = judge(&row);
            match &verdict {
                Verdict::Passed(_) => writeln!(out, "ok          {}  {}", row.id, row.topic)?,
                Verdict::Unsupported(why) => {
                    writeln!(out, "unsupported {}  {}: {why}", row.id, row.topic)?;
                }
                Verdict::Failed(troubles) => {
                    let all = troubles.join("; ");
                    writeln!(out, "FAIL        {}  {}: {all}", row.id, row.topic)?;
                }
            }
            tally.count(&row, &verdict);
        }
    }
    for line in tally.worst_errors() {
        writeln!(out, "{line}")?;
    }
    writeln!(out, "{tally}")?;
    Ok(if tally.failed > 0 { ROW_FAILED } else { 0 })
}
