//! Prints the worked sheet of a sheet file as JSON: every figure with its value, unit, ink and working.
//!
//! `cargo run --release --example summary -- FILE`. Exit status: 0, or 2 where the file is no sheet. DEVELOPERS.md
//! describes the JSON field by field.

mod summary_json;

use std::io::{self, BufWriter, Write};
use std::process::ExitCode;
use ventrail::sheet::Document;
use ventrail::{file, words};

const NOT_A_SHEET: u8 = 2;

fn main() -> ExitCode {
    let arguments: Vec<String> = std::env::args().skip(1).collect();
    let [path] = arguments.as_slice() else {
        eprintln!("Give one sheet file.");
        return ExitCode::from(NOT_A_SHEET);
    };
    let document = match document_in(path) {
        Ok(document) => document,
        Err(why) => {
            eprintln!("{path}: {why}");
            return ExitCode::from(NOT_A_SHEET);
        }
    };
    let mut out = BufWriter::new(io::stdout().lock());
    let printed = summary_json::write_summary(&document, &mut out)
        .and_then(|()| writeln!(out))
        .and_then(|()| out.flush());
    match printed {
        Ok(()) => ExitCode::SUCCESS,
        Err(error) => {
            eprintln!("{path}: {error}");
            ExitCode::FAILURE
        }
    }
}

fn document_in(path: &str) -> Result<Document, String> {
    let text = std::fs::read_to_string(path).map_err(|error| error.to_string())?;
    file::read(&text).map_err(|refusal| words::file_refusal(&refusal))
}
