//! The house rules of `src/`, read off the sources: who may use whom, what stays in one room, and where sentences live.
//!
//! Rooms are listed from the ground up; a room uses only rooms before it. Each check is a function from sources to
//! findings, so that it is proven twice: on `src/`, which must have none, and on a few lines made to break it.

#![allow(
    clippy::expect_used,
    clippy::panic,
    reason = "a source which cannot be read, or the like, is to be seen at once"
)]

use std::collections::{BTreeMap, BTreeSet};
use std::fmt;
use std::fs;
use std::path::{Path, PathBuf};

/// The rooms, in the order in which they may use each other.
const ROOMS: [&str; 14] = [
    "math", "quantity", "working", "tables", "physics", "sizing", "sheet", "assume", "work",
    "entry", "file", "words", "browser", "ui",
];

/// Arrows which the order would allow and the description of the room rules out: formulas know no tables and no
/// findings, and what wraps the browser knows nothing of the trade.
const NEVER: [(&str, &[&str]); 2] = [
    ("physics", &["working", "tables"]),
    (
        "browser",
        &[
            "math", "quantity", "working", "tables", "physics", "sizing", "sheet", "assume",
            "work", "entry", "file", "words",
        ],
    ),
];

/// Packages which belong to some rooms alone. `main` is the browser's entry, `src/main.rs`.
const PACKAGES: [(&str, &[&str]); 8] = [
    ("leptos", &["ui", "main"]),
    ("wasm_bindgen", &["browser", "ui", "main"]),
    ("js_sys", &["browser", "ui", "main"]),
    ("web_sys", &["browser", "ui", "main"]),
    ("serde_wasm_bindgen", &["browser", "ui", "main"]),
    ("serde", &["file", "browser", "ui"]),
    ("serde_json", &["file"]),
    ("libm", &["math"]),
];

/// Words from which on a literal is a sentence.
const SENTENCE: usize = 4;

/// Where the fixed texts of the page stand, each as `name = "text";`.
const TEXTS: &str = "words/page.rs";

/// Fields whose texts are citations or expressions, not sentences, and the only files which have them.
const CITATIONS: [(&str, &[&str]); 2] = [
    ("sizing/rules.rs", &["clause", "expression"]),
    ("working/sources.rs", &["title", "edition"]),
];

/// Where the spellings stand in which answers may be typed: words to be recognised, which nobody is shown. They are
/// plain, in small letters without marks; anything else in that file is a sentence as anywhere.
const SPELLINGS: &str = "entry/choices.rs";

#[test]
fn rooms_stand_in_the_library_in_the_order_in_which_they_may_use_each_other() {
    let library = Source::read(Path::new("lib.rs"));
    let declared: Vec<&str> = library
        .tokens
        .windows(2)
        .filter(|pair| pair.first().is_some_and(|token| token.is_word("mod")))
        .filter_map(|pair| pair.last()?.word())
        .collect();
    assert_eq!(declared, ROOMS);
}

#[test]
fn rooms_use_only_rooms_before_them() {
    report(&sources(), arrows);
}

#[test]
fn an_arrow_against_the_order_is_found_however_it_is_written() {
    for text in [
        "use crate::sizing::device::Device;",
        "use crate::{math::power, sizing::device::Device};",
        "fn f() -> crate::sizing::device::Device { loop {} }",
        "use super::super::sizing::device::Device;",
        "mod inner { use super::super::super::sizing::device::Device; }",
        "use crate::unheard_of::Thing;",
    ] {
        expect_one(arrows, "tables/nec_motors.rs", text);
    }
    expect_one(
        arrows,
        "tables/mod.rs",
        "use super::sizing::device::Device;",
    );
    expect_one(arrows, "physics/heat.rs", "use crate::tables::Metal;");
    expect_one(arrows, "browser/store.rs", "use crate::sheet::Sheet;");
    expect_none(
        arrows,
        "sizing/device.rs",
        "use crate::tables::{self, Metal}; use super::conductor::RunInput; use crate::sizing::rules;",
    );
    expect_none(
        arrows,
        "math.rs",
        "#[cfg(test)] mod tests { use crate::words::label; } // use crate::ui::page;",
    );
}

#[test]
fn the_rules_are_asked_by_the_worked_sheet_alone() {
    report(&sources(), callers_of_sizing);
}

#[test]
fn a_rule_asked_from_elsewhere_is_found() {
    expect_one(
        callers_of_sizing,
        "words/notes.rs",
        "use crate::sizing::device::{Device, disconnect};",
    );
    expect_one(
        callers_of_sizing,
        "words/notes.rs",
        "fn f() { crate::sizing::device::disconnect(&x); }",
    );
    expect_none(
        callers_of_sizing,
        "words/notes.rs",
        "use crate::sizing::device::{self, Device}; use crate::sizing::rules::{self, DISCONNECT};",
    );
    expect_none(
        callers_of_sizing,
        "work/feeder.rs",
        "use crate::sizing::device::disconnect;",
    );
}

#[test]
fn packages_of_the_browser_and_of_the_file_stay_in_their_rooms() {
    report(&sources(), packages);
}

#[test]
fn a_package_outside_its_room_is_found() {
    expect_one(packages, "work/sheet.rs", "use leptos::prelude::*;");
    expect_one(packages, "words/mod.rs", "fn f(e: &web_sys::Event) {}");
    expect_one(
        packages,
        "physics/air.rs",
        "fn f() { libm::pow(1.0, 2.0); }",
    );
    expect_none(
        packages,
        "ui/grid.rs",
        "use leptos::prelude::*; use web_sys::Event;",
    );
    expect_none(packages, "main.rs", "use leptos::prelude::*;");
    expect_none(
        packages,
        "bin/pack.rs",
        "use wasm_bindgen_cli_support::Bindgen;",
    );
}

#[test]
fn functions_which_round_differently_on_other_machines_are_called_in_math_alone() {
    report(&sources(), |sources| {
        rounding(sources, &forbidden_functions())
    });
}

#[test]
fn a_function_which_rounds_differently_is_found() {
    let forbidden = forbidden_functions();
    assert!(
        ["sin", "powf", "powi", "ln", "exp"]
            .iter()
            .all(|name| forbidden.contains(*name)),
        "{forbidden:?}"
    );
    let check = |sources: &[Source]| rounding(sources, &forbidden);
    expect_one(
        check,
        "physics/air.rs",
        "fn f(x: f64) -> f64 { x.powf(2.0) }",
    );
    expect_one(
        check,
        "physics/air.rs",
        "fn f(x: f64) -> f64 { f64::ln(x) }",
    );
    expect_none(check, "math.rs", "fn f(x: f64) -> f64 { x.powf(2.0) }");
    expect_none(check, "physics/air.rs", "fn f(x: f64) -> f64 { x.sqrt() }");
}

#[test]
fn every_rule_is_unique_listed_and_cited() {
    report(&sources(), rules);
    let written: BTreeSet<String> = rule_statics(&sources())
        .into_iter()
        .map(|rule| rule.id)
        .collect();
    let listed: BTreeSet<String> = ventrail::sizing::rules::all()
        .iter()
        .map(|rule| rule.id.to_owned())
        .collect();
    assert_eq!(
        written, listed,
        "the list of all rules and the rules written differ"
    );
}

#[test]
fn a_rule_which_is_doubled_uncited_misnamed_or_out_of_place_is_found() {
    let written = |name: &str, id: &str| {
        format!("pub static {name}: Rule = Rule {{ id: \"{id}\", gives: \"x\" }};")
    };
    let rules_file = |text: &str| Source::of("sizing/rules.rs", text);
    let citing = |text: &str| Source::of("sizing/device.rs", text);
    let count = |sources: &[Source]| rules(sources).len();
    let sound = written("A", "sizing.a.b");
    assert_eq!(count(&[rules_file(&sound), citing("rules::A.figure()")]), 0);
    assert_eq!(count(&[rules_file(&sound), citing("rules::B.figure()")]), 1);
    let doubled = format!("{sound} {}", written("B", "sizing.a.b"));
    assert_eq!(
        count(&[rules_file(&doubled), citing("rules::A rules::B")]),
        1
    );
    for id in ["sizing.a", "kitchen.a.b", "sizing.a.b.c", "sizing.A.b"] {
        let misnamed = written("A", id);
        assert_eq!(
            count(&[rules_file(&misnamed), citing("rules::A")]),
            1,
            "{id}"
        );
    }
    assert_eq!(count(&[citing(&sound), Source::of("work/a.rs", "A")]), 1);
}

#[test]
fn sentences_which_are_shown_stand_in_words_alone() {
    report(&sources(), sentences);
}

#[test]
fn a_sentence_outside_words_is_found() {
    let sentence = "const S: &str = \"the drive is too hot\";";
    expect_one(sentences, "sizing/device.rs", sentence);
    expect_one(
        sentences,
        "ui/grid.rs",
        "view! { <p>\"the drive is too hot\"</p> }",
    );
    expect_one(
        sentences,
        "file/json.rs",
        "let s = r#\"the \"drive\" is too hot\"#;",
    );
    expect_one(
        sentences,
        "sizing/device.rs",
        "let s = format!(\"the {drive} stands in {air} of air\");",
    );
    expect_one(
        sentences,
        "entry/choices.rs",
        "const S: &str = \"There is no such answer.\";",
    );
    expect_one(
        sentences,
        "sizing/device.rs",
        "Rule { clause: \"a clause of four words\" }",
    );
    for (path, text) in [
        ("words/notes.rs", sentence),
        (
            "sizing/device.rs",
            "// \"the drive is too hot\"\n/* \"the drive is too hot\" */",
        ),
        (
            "sizing/device.rs",
            "#[allow(dead_code, reason = \"the drive is too hot\")] fn f() {}",
        ),
        (
            "sizing/device.rs",
            "#[cfg(test)] mod tests { const S: &str = \"the drive is too hot\"; }",
        ),
        (
            "sizing/rules.rs",
            "Rule { clause: \"a clause of four words\" }",
        ),
        ("sizing/device.rs", "const S: &str = \"three words only\";"),
        (
            "sizing/device.rs",
            "const S: &str = \"{} {} {} {} {}\"; const C: char = '\"';",
        ),
        (
            "entry/choices.rs",
            "const S: &str = \"row end against a wall\";",
        ),
    ] {
        expect_none(sentences, path, text);
    }
}

#[test]
fn every_text_of_the_page_is_used() {
    let sources = sources();
    let written: Vec<String> = page_texts(&sources)
        .into_iter()
        .map(|(_, name)| name)
        .collect();
    let listed: Vec<&str> = ventrail::words::page::ALL
        .iter()
        .map(|(name, _)| *name)
        .collect();
    assert_eq!(written, listed, "not every text of {TEXTS} is looked at");
    report(&sources, unused_texts);
}

#[test]
fn a_text_of_the_page_which_is_used_nowhere_is_found() {
    let count = |page: &str, other: (&str, &str)| {
        unused_texts(&[Source::of(TEXTS, page), Source::of(other.0, other.1)]).len()
    };
    let text = "texts! { undo = \"Undo\"; }";
    assert_eq!(count(text, ("ui/bar.rs", "fn f() { page::undo() }")), 0);
    assert_eq!(
        count(text, ("ui/bar.rs", "fn f() { words::page::undo() }")),
        0
    );
    assert_eq!(
        count(text, ("ui/bar.rs", "use crate::words::page::{undo};")),
        0
    );
    assert_eq!(
        count(text, ("ui/bar.rs", "// page::undo()\nfn undo() {}")),
        1
    );
    assert_eq!(count(text, ("ui/bar.rs", "fn f() { history.undo() }")), 1);
    let with_a_use = format!("{text} pub fn undo_named() -> String {{ undo().to_owned() }}");
    assert_eq!(count(&with_a_use, ("ui/bar.rs", "")), 0);
}

#[test]
fn every_file_says_at_its_head_what_it_is() {
    report(&sources(), heads);
}

#[test]
fn a_file_without_a_head_is_found() {
    expect_one(heads, "sizing/device.rs", "use crate::math;\n//! Too late.");
    expect_one(heads, "sizing/mod.rs", "//! Choices. Here: something.");
    expect_one(heads, "math.rs", "//! Powers. Not here: something.");
    expect_none(heads, "sizing/device.rs", "//! The branch device.");
    expect_none(
        heads,
        "sizing/mod.rs",
        "//! Choices.\n//!\n//! Here: some. Not here:\n//! others.",
    );
}

// --- the checks -----------------------------------------------------------------------------------------------------

/// Uses of a room which stands after the user's own, which the user may never know, or which is no room.
fn arrows(sources: &[Source]) -> Vec<Finding> {
    let rank = |room: &str| ROOMS.iter().position(|known| *known == room);
    let mut found = Vec::new();
    for source in sources {
        let Some(own) = source.room().and_then(rank) else {
            continue;
        };
        let never = source
            .room()
            .and_then(|room| NEVER.iter().find(|(name, _)| *name == room))
            .map_or(&[][..], |(_, never)| never);
        for (line, used) in source.names_at_the_root() {
            match rank(&used) {
                None => found.push(source.finding(line, format!("`{used}` is no room"))),
                Some(other) if other > own => {
                    found.push(
                        source.finding(line, format!("uses `{used}`, which stands above it")),
                    );
                }
                Some(_) if never.contains(&used.as_str()) => {
                    found.push(
                        source.finding(line, format!("uses `{used}`, which it must not know")),
                    );
                }
                Some(_) => {}
            }
        }
    }
    found
}

/// Functions of `sizing` which another room than `work` takes: it may know the types and the list of rules.
fn callers_of_sizing(sources: &[Source]) -> Vec<Finding> {
    let mut found = Vec::new();
    for source in sources {
        if matches!(source.room(), None | Some("sizing" | "work")) {
            continue;
        }
        for (line, path) in source.paths() {
            let names: Vec<&str> = path.iter().map(String::as_str).collect();
            if let ["crate", "sizing", module, name, ..] = names.as_slice()
                && *module != "rules"
                && *name != "self"
                && name.starts_with(|first: char| first.is_lowercase())
            {
                found
                    .push(source.finding(line, format!("takes the function `{name}` of `sizing`")));
            }
        }
    }
    found
}

fn packages(sources: &[Source]) -> Vec<Finding> {
    let mut found = Vec::new();
    for source in sources {
        // The packing program is native, and no part of the page.
        if source.top() == "bin" {
            continue;
        }
        for token in &source.tokens {
            let Some((name, rooms)) = PACKAGES.iter().find(|(name, _)| token.is_word(name)) else {
                continue;
            };
            if !rooms.contains(&source.top()) {
                found.push(source.finding(token.line, format!("uses the package `{name}`")));
            }
        }
    }
    found
}

fn rounding(sources: &[Source], forbidden: &BTreeSet<String>) -> Vec<Finding> {
    let mut found = Vec::new();
    for source in sources {
        if source.top() == "math" {
            continue;
        }
        for three in source.tokens.windows(3) {
            let [before, name, after] = three else {
                continue;
            };
            let Some(function) = name.word().filter(|word| forbidden.contains(*word)) else {
                continue;
            };
            if (before.is_mark('.') || before.is_mark(':')) && after.is_mark('(') {
                found.push(source.finding(name.line, format!("calls `{function}`")));
            }
        }
    }
    found
}

/// The functions which `.clippy.toml` forbids outside `math`: one list for both checks.
fn forbidden_functions() -> BTreeSet<String> {
    include_str!("../.clippy.toml")
        .split("path = \"f64::")
        .skip(1)
        .filter_map(|rest| Some(rest.split_once('"')?.0.to_owned()))
        .collect()
}

/// A rule as it is written down.
struct WrittenRule {
    name: String,
    id: String,
    path: String,
    line: usize,
}

fn rule_statics(sources: &[Source]) -> Vec<WrittenRule> {
    let mut written = Vec::new();
    for source in sources {
        for (at, token) in source.tokens.iter().enumerate() {
            let following = source.tokens.get(at..at + 5).unwrap_or_default();
            let [first, name, colon, kind, equals] = following else {
                continue;
            };
            let is_rule = first.is_word("static")
                && colon.is_mark(':')
                && kind.is_word("Rule")
                && equals.is_mark('=');
            if !is_rule {
                continue;
            }
            let id = source
                .tokens
                .get(at..)
                .unwrap_or_default()
                .windows(3)
                .find(|three| {
                    matches!(three, [id, colon, _] if id.is_word("id") && colon.is_mark(':'))
                })
                .and_then(|three| three.last()?.text());
            written.push(WrittenRule {
                name: name.word().unwrap_or_default().to_owned(),
                id: id.unwrap_or_default().to_owned(),
                path: source.path.clone(),
                line: token.line,
            });
        }
    }
    written
}

fn rules(sources: &[Source]) -> Vec<Finding> {
    let home = "sizing/rules.rs";
    let mut found = Vec::new();
    let mut seen = BTreeSet::new();
    for rule in rule_statics(sources) {
        let mut say = |what: String| {
            found.push(Finding {
                path: rule.path.clone(),
                line: rule.line,
                what,
            });
        };
        if rule.path != home {
            say(format!("the rule {} stands outside {home}", rule.name));
        }
        if !seen.insert(rule.id.clone()) {
            say(format!("the id {:?} is used twice", rule.id));
        }
        let parts: Vec<&str> = rule.id.split('.').collect();
        let is_named_well = matches!(parts.as_slice(), [room, subject, name]
            if ROOMS.contains(room) && is_plain(subject) && is_plain(name));
        if !is_named_well {
            say(format!("the id {:?} is not room.subject.rule", rule.id));
        }
        let is_cited = sources
            .iter()
            .filter(|source| source.path != home && source.path != rule.path)
            .any(|source| source.tokens.iter().any(|token| token.is_word(&rule.name)));
        if !is_cited {
            say(format!("the rule {} is cited nowhere", rule.name));
        }
    }
    found
}

fn is_plain(name: &str) -> bool {
    !name.is_empty()
        && name.chars().all(|character| {
            character.is_ascii_lowercase() || character.is_ascii_digit() || character == '_'
        })
}

fn sentences(sources: &[Source]) -> Vec<Finding> {
    let mut found = Vec::new();
    for source in sources {
        // The packing program speaks to whoever builds the page, at a terminal.
        if matches!(source.top(), "words" | "bin") {
            continue;
        }
        let citations = CITATIONS
            .iter()
            .find(|(path, _)| *path == source.path)
            .map_or(&[][..], |(_, fields)| fields);
        for (at, token) in source.tokens.iter().enumerate() {
            let Some(text) = token.text() else {
                continue;
            };
            let words = words_of(text);
            if words < SENTENCE {
                continue;
            }
            let mut before = source.tokens.iter().take(at).rev();
            let (mark, name) = (before.next(), before.next().and_then(Token::word));
            let is_citation = mark.is_some_and(|mark| mark.is_mark(':'))
                && name.is_some_and(|name| citations.contains(&name));
            let is_spelling = source.path == SPELLINGS
                && text
                    .chars()
                    .all(|character| matches!(character, 'a'..='z' | '0'..='9' | ' '));
            if !is_citation && !is_spelling {
                found.push(source.finding(token.line, format!("says {text:?}, {words} words")));
            }
        }
    }
    found
}

/// Words of a literal as a reader would count them; what stands between braces is filled in later.
fn words_of(text: &str) -> usize {
    let mut plain = String::new();
    let mut depth = 0_u32;
    for character in text.chars() {
        match character {
            '{' => depth += 1,
            '}' => depth = depth.saturating_sub(1),
            _ if depth == 0 => plain.push(character),
            _ => {}
        }
    }
    plain
        .split_whitespace()
        .map(|word| word.trim_matches(|character: char| !character.is_alphanumeric()))
        .filter(|word| !word.is_empty())
        .filter(|word| {
            word.chars()
                .all(|character| character.is_alphabetic() || matches!(character, '\'' | '-' | '’'))
        })
        .count()
}

/// The fixed texts of the page, each with its line and name.
fn page_texts(sources: &[Source]) -> Vec<(usize, String)> {
    sources
        .iter()
        .filter(|source| source.path == TEXTS)
        .flat_map(|source| source.tokens.windows(5))
        .filter_map(|five| match five {
            [before, name, equals, text, end]
                if (before.is_mark('{') || before.is_mark(';'))
                    && equals.is_mark('=')
                    && text.text().is_some()
                    && end.is_mark(';') =>
            {
                Some((name.line, name.word()?.to_owned()))
            }
            _ => None,
        })
        .collect()
}

/// Fixed texts of the page which nothing asks for: neither as `page::name`, nor within their own file as `name()`.
fn unused_texts(sources: &[Source]) -> Vec<Finding> {
    let mut used = BTreeSet::new();
    for source in sources {
        for (_, path) in source.paths() {
            for two in path.windows(2) {
                if let [module, name] = two
                    && module == "page"
                {
                    used.insert(name.clone());
                }
            }
        }
        for two in source.tokens.windows(2).filter(|_| source.path == TEXTS) {
            if let [name, mark] = two
                && mark.is_mark('(')
            {
                used.extend(name.word().map(str::to_owned));
            }
        }
    }
    page_texts(sources)
        .into_iter()
        .filter(|(_, name)| !used.contains(name))
        .map(|(line, name)| Finding {
            path: TEXTS.to_owned(),
            line,
            what: format!("the text `{name}` is used nowhere"),
        })
        .collect()
}

fn heads(sources: &[Source]) -> Vec<Finding> {
    let mut found = Vec::new();
    for source in sources {
        if source.head.is_empty() {
            found.push(source.finding(1, "has no head".to_owned()));
            continue;
        }
        let is_a_room = source.room().is_some_and(|room| {
            source.path == format!("{room}.rs") || source.path == format!("{room}/mod.rs")
        });
        let says = |words: &str| source.head.contains(words);
        if is_a_room
            && !(says("Not here:") && source.head.replace("Not here:", "").contains("Here:"))
        {
            found.push(source.finding(
                1,
                "does not say what is here and what is not here".to_owned(),
            ));
        }
    }
    found
}

// --- sources --------------------------------------------------------------------------------------------------------

/// One thing which breaks a house rule.
struct Finding {
    path: String,
    line: usize,
    what: String,
}

impl fmt::Display for Finding {
    fn fmt(&self, to: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(to, "src/{}:{}: {}", self.path, self.line, self.what)
    }
}

#[track_caller]
fn report(sources: &[Source], check: impl Fn(&[Source]) -> Vec<Finding>) {
    let found: Vec<String> = check(sources).iter().map(Finding::to_string).collect();
    assert!(found.is_empty(), "\n{}\n", found.join("\n"));
}

#[track_caller]
fn expect_one(check: impl Fn(&[Source]) -> Vec<Finding>, path: &str, text: &str) {
    let found: Vec<String> = check(&[Source::of(path, text)])
        .iter()
        .map(Finding::to_string)
        .collect();
    assert_eq!(found.len(), 1, "{path}: {text}\n{found:?}");
}

#[track_caller]
fn expect_none(check: impl Fn(&[Source]) -> Vec<Finding>, path: &str, text: &str) {
    let found: Vec<String> = check(&[Source::of(path, text)])
        .iter()
        .map(Finding::to_string)
        .collect();
    assert!(found.is_empty(), "{path}: {text}\n{found:?}");
}

/// A source as the checks see it: without comments, attributes and unit tests.
struct Source {
    /// Its path below `src/`, with slashes.
    path: String,
    /// The text of the `//!` lines with which it begins.
    head: String,
    tokens: Vec<Token>,
}

#[derive(Debug, Clone, PartialEq)]
struct Token {
    line: usize,
    kind: Kind,
}

#[derive(Debug, Clone, PartialEq)]
enum Kind {
    /// A name, a keyword or a number.
    Word(String),
    /// A literal text, as written between its quotes.
    Text(String),
    /// Any other character.
    Mark(char),
}

impl Token {
    fn word(&self) -> Option<&str> {
        match &self.kind {
            Kind::Word(word) => Some(word),
            _ => None,
        }
    }

    fn text(&self) -> Option<&str> {
        match &self.kind {
            Kind::Text(text) => Some(text),
            _ => None,
        }
    }

    fn is_word(&self, wanted: &str) -> bool {
        self.word() == Some(wanted)
    }

    fn is_mark(&self, wanted: char) -> bool {
        self.kind == Kind::Mark(wanted)
    }
}

fn sources() -> Vec<Source> {
    let root = root();
    let mut paths = Vec::new();
    collect(&root, &mut paths);
    paths.sort();
    assert!(paths.len() > ROOMS.len(), "src/ is not where it should be");
    paths
        .iter()
        .map(|path| Source::read(path.strip_prefix(&root).expect("a path below src/")))
        .collect()
}

fn root() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("src")
}

fn collect(folder: &Path, paths: &mut Vec<PathBuf>) {
    for entry in fs::read_dir(folder).expect("a readable folder") {
        let path = entry.expect("an entry of the folder").path();
        if path.is_dir() {
            collect(&path, paths);
        } else if path.extension().is_some_and(|extension| extension == "rs") {
            paths.push(path);
        }
    }
}

impl Source {
    fn read(path: &Path) -> Self {
        let text = fs::read_to_string(root().join(path)).expect("a readable source");
        let parts: Vec<_> = path.iter().map(|part| part.to_string_lossy()).collect();
        Self::of(&parts.join("/"), &text)
    }

    fn of(path: &str, text: &str) -> Self {
        let head: Vec<&str> = text
            .lines()
            .map_while(|line| line.strip_prefix("//!"))
            .collect();
        Self {
            path: path.to_owned(),
            head: head.join(" "),
            tokens: without_unit_tests(without_attributes(tokens_of(text))),
        }
    }

    fn finding(&self, line: usize, what: String) -> Finding {
        Finding {
            path: self.path.clone(),
            line,
            what,
        }
    }

    /// The first part of the path: the room, `main`, `lib` or `bin`.
    fn top(&self) -> &str {
        let first = self.path.split('/').next().unwrap_or_default();
        first.strip_suffix(".rs").unwrap_or(first)
    }

    fn room(&self) -> Option<&str> {
        let top = self.top();
        (!matches!(top, "main" | "lib" | "bin")).then_some(top)
    }

    /// How many modules deep the file itself stands below the root of the library.
    fn depth(&self) -> usize {
        let parts = self.path.split('/').count();
        if self.path.ends_with("/mod.rs") {
            parts - 1
        } else {
            parts
        }
    }

    /// Every name which is looked up in the root of the library, with its line.
    fn names_at_the_root(&self) -> Vec<(usize, String)> {
        self.paths()
            .into_iter()
            .filter_map(|(line, path)| match path.as_slice() {
                [first, name, ..] if first == "crate" => Some((line, name.clone())),
                _ => None,
            })
            .filter(|(_, name)| name != "self")
            .collect()
    }

    /// Every path with two parts or more, groups unfolded, and the parts of `super` which lead to the root written as
    /// `crate`.
    fn paths(&self) -> Vec<(usize, Vec<String>)> {
        let mut found = Vec::new();
        let mut at = 0;
        // Brace depths at which inner modules were opened.
        let mut inner = Vec::new();
        let mut depth = 0_usize;
        while let Some(token) = self.tokens.get(at) {
            let next_but_one = self.tokens.get(at + 2);
            if token.is_word("mod") && next_but_one.is_some_and(|token| token.is_mark('{')) {
                inner.push(depth);
                depth += 1;
                at += 3;
                continue;
            }
            if token.is_mark('{') {
                depth += 1;
            } else if token.is_mark('}') {
                depth = depth.saturating_sub(1);
                if inner.last() == Some(&depth) {
                    inner.pop();
                }
            }
            if token.word().is_some() && self.colons_follow(at) {
                let mut of_path = Vec::new();
                at = self.path_from(at, &mut Vec::new(), &mut of_path);
                let root = self.depth() + inner.len();
                found.extend(
                    of_path
                        .into_iter()
                        .map(|(line, path)| (line, from_root(path, root))),
                );
                continue;
            }
            at += 1;
        }
        found
    }

    fn colons_follow(&self, at: usize) -> bool {
        let is_colon = |at: usize| self.tokens.get(at).is_some_and(|token| token.is_mark(':'));
        is_colon(at + 1) && is_colon(at + 2)
    }

    /// Reads the path which begins at `at`, below `before`; gives where it ends.
    fn path_from(
        &self,
        at: usize,
        before: &mut Vec<String>,
        found: &mut Vec<(usize, Vec<String>)>,
    ) -> usize {
        let Some(token) = self.tokens.get(at) else {
            return at;
        };
        if token.is_mark('{') {
            return self.group_from(at + 1, before, found);
        }
        let Some(word) = token.word() else {
            if !before.is_empty() {
                found.push((token.line, before.clone()));
            }
            return at;
        };
        before.push(word.to_owned());
        let end = if self.colons_follow(at) {
            self.path_from(at + 3, before, found)
        } else {
            found.push((token.line, before.clone()));
            at + 1
        };
        before.pop();
        end
    }

    /// Reads the group of a `use`, or gives up at once where the brace is not one.
    fn group_from(
        &self,
        start: usize,
        before: &mut Vec<String>,
        found: &mut Vec<(usize, Vec<String>)>,
    ) -> usize {
        let mut at = start;
        while let Some(token) = self.tokens.get(at) {
            if token.is_mark('}') {
                return at + 1;
            }
            let next = if token.word().is_some() {
                self.path_from(at, before, found)
            } else {
                at + 1
            };
            at = next.max(at + 1);
        }
        at
    }
}

/// The path with `crate` in place of as many `super` as lead to the root.
fn from_root(path: Vec<String>, depth: usize) -> Vec<String> {
    let ups = path.iter().take_while(|part| *part == "super").count();
    if ups == depth {
        std::iter::once("crate".to_owned())
            .chain(path.into_iter().skip(ups))
            .collect()
    } else {
        path
    }
}

fn without_attributes(tokens: Vec<Token>) -> Vec<Token> {
    let mut kept: Vec<Token> = Vec::new();
    let mut at = 0;
    while let Some(token) = tokens.get(at) {
        let bang = usize::from(tokens.get(at + 1).is_some_and(|token| token.is_mark('!')));
        let opens = tokens
            .get(at + 1 + bang)
            .is_some_and(|token| token.is_mark('['));
        if !(token.is_mark('#') && opens) {
            kept.push(token.clone());
            at += 1;
            continue;
        }
        let end = closing(&tokens, at + 1 + bang);
        let inside: Vec<&str> = tokens
            .get(at..end)
            .unwrap_or_default()
            .iter()
            .filter_map(Token::word)
            .collect();
        if inside == ["cfg", "test"] {
            kept.push(Token {
                line: token.line,
                kind: Kind::Word(UNIT_TESTS.to_owned()),
            });
        }
        at = end + 1;
    }
    kept
}

/// Stands for `#[cfg(test)]` between the two passes; no name of Rust can be written so.
const UNIT_TESTS: &str = "unit tests";

fn without_unit_tests(tokens: Vec<Token>) -> Vec<Token> {
    let mut kept = Vec::new();
    let mut at = 0;
    while let Some(token) = tokens.get(at) {
        if !token.is_word(UNIT_TESTS) {
            kept.push(token.clone());
            at += 1;
            continue;
        }
        let body = (at..tokens.len()).find(|at| {
            tokens
                .get(*at)
                .is_some_and(|token| token.is_mark('{') || token.is_mark(';'))
        });
        at = match body {
            Some(body) if tokens.get(body).is_some_and(|token| token.is_mark('{')) => {
                closing(&tokens, body) + 1
            }
            Some(semicolon) => semicolon + 1,
            None => tokens.len(),
        };
    }
    kept
}

/// Where the bracket which opens at `open` is closed.
fn closing(tokens: &[Token], open: usize) -> usize {
    let mut depth = 0_usize;
    for (at, token) in tokens.iter().enumerate().skip(open) {
        match token.kind {
            Kind::Mark('[' | '(' | '{') => depth += 1,
            Kind::Mark(']' | ')' | '}') => {
                depth = depth.saturating_sub(1);
                if depth == 0 {
                    return at;
                }
            }
            _ => {}
        }
    }
    tokens.len()
}

/// The tokens of a Rust source, as far as these checks tell them apart; comments are left out.
fn tokens_of(source: &str) -> Vec<Token> {
    let mut reader = Reader {
        characters: source.chars().collect(),
        at: 0,
        line: 1,
    };
    let mut tokens = Vec::new();
    while let Some(character) = reader.peek(0) {
        let line = reader.line;
        let kind = match character {
            _ if character.is_whitespace() => {
                reader.next();
                continue;
            }
            '/' if reader.peek(1) == Some('/') => {
                reader.take_while(|character| character != '\n');
                continue;
            }
            '/' if reader.peek(1) == Some('*') => {
                reader.skip_block_comment();
                continue;
            }
            '"' => Kind::Text(reader.take_text()),
            '\'' if reader.is_character() => {
                reader.skip_character();
                continue;
            }
            _ if character.is_alphanumeric() || character == '_' => {
                let word =
                    reader.take_while(|character| character.is_alphanumeric() || character == '_');
                match reader.raw_text_after(&word) {
                    Some(text) => Kind::Text(text),
                    None => Kind::Word(word),
                }
            }
            _ => {
                reader.next();
                Kind::Mark(character)
            }
        };
        tokens.push(Token { line, kind });
    }
    tokens
}

struct Reader {
    characters: Vec<char>,
    at: usize,
    line: usize,
}

impl Reader {
    fn peek(&self, ahead: usize) -> Option<char> {
        self.characters.get(self.at + ahead).copied()
    }

    fn next(&mut self) -> Option<char> {
        let character = self.peek(0)?;
        self.at += 1;
        if character == '\n' {
            self.line += 1;
        }
        Some(character)
    }

    fn take_while(&mut self, wanted: impl Fn(char) -> bool) -> String {
        let mut taken = String::new();
        while let Some(character) = self.peek(0).filter(|character| wanted(*character)) {
            taken.push(character);
            self.next();
        }
        taken
    }

    fn skip_block_comment(&mut self) {
        let mut depth = 0_usize;
        loop {
            match (self.peek(0), self.peek(1)) {
                (Some('/'), Some('*')) => depth += 1,
                (Some('*'), Some('/')) => depth -= 1,
                (None, _) => return,
                _ => {
                    self.next();
                    continue;
                }
            }
            self.next();
            self.next();
            if depth == 0 {
                return;
            }
        }
    }

    /// A text in plain quotes; escapes are kept as written, but a line which is continued is joined.
    fn take_text(&mut self) -> String {
        self.next();
        let mut text = String::new();
        while let Some(character) = self.next() {
            match character {
                '"' => break,
                '\\' if self.peek(0) == Some('\n') => {
                    self.take_while(char::is_whitespace);
                }
                '\\' => {
                    text.push(' ');
                    self.next();
                }
                _ => text.push(character),
            }
        }
        text
    }

    /// The raw text, bytes or C text which begins with the prefix just read, if one does.
    fn raw_text_after(&mut self, prefix: &str) -> Option<String> {
        let is_raw = matches!(prefix, "r" | "br" | "cr");
        let hashes = (0..)
            .take_while(|ahead| is_raw && self.peek(*ahead) == Some('#'))
            .count();
        if self.peek(hashes) != Some('"') {
            return None;
        }
        if !is_raw {
            return matches!(prefix, "b" | "c").then(|| self.take_text());
        }
        for _ in 0..=hashes {
            self.next();
        }
        let mut text = String::new();
        while let Some(character) = self.next() {
            let is_end = character == '"' && (0..hashes).all(|ahead| self.peek(ahead) == Some('#'));
            if is_end {
                for _ in 0..hashes {
                    self.next();
                }
                break;
            }
            text.push(character);
        }
        Some(text)
    }

    /// Whether the quote begins a character and not a lifetime.
    fn is_character(&self) -> bool {
        self.peek(1) == Some('\\') || self.peek(2) == Some('\'')
    }

    fn skip_character(&mut self) {
        self.next();
        while let Some(character) = self.next() {
            match character {
                '\\' => {
                    self.next();
                }
                '\'' => return,
                _ => {}
            }
        }
    }
}

/// The reader itself, on what could lead it astray.
#[test]
fn sources_are_read_with_their_lines() {
    let text = "a // \"x\"\n'b' 'c \"d\\\" e\" r#\"f \" g\"# '\\'' /* h /* i */ j */ k\n#[l(\"m\")] b\"n\"";
    let read: Vec<(usize, String)> = Source::of("x.rs", text)
        .tokens
        .into_iter()
        .map(|token| {
            let shown = match token.kind {
                Kind::Word(word) => word,
                Kind::Text(text) => format!("<{text}>"),
                Kind::Mark(mark) => mark.to_string(),
            };
            (token.line, shown)
        })
        .collect();
    let expected = [
        (1, "a"),
        (2, "'"),
        (2, "c"),
        (2, "<d  e>"),
        (2, "<f \" g>"),
        (2, "k"),
        (3, "<n>"),
    ];
    let expected: Vec<(usize, String)> = expected
        .into_iter()
        .map(|(line, shown)| (line, shown.to_owned()))
        .collect();
    assert_eq!(read, expected);
    let of_lines: BTreeMap<usize, Vec<String>> = Source::of("a/b.rs", "x::y;\nuse c::{d, e::f};")
        .paths()
        .into_iter()
        .fold(BTreeMap::new(), |mut lines, (line, path)| {
            lines
                .entry(line)
                .or_insert_with(Vec::new)
                .push(path.join("::"));
            lines
        });
    assert_eq!(
        of_lines,
        BTreeMap::from([
            (1, vec!["x::y".to_owned()]),
            (2, vec!["c::d".to_owned(), "c::e::f".to_owned()])
        ])
    );
}
