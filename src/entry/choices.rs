//! How answers are written.

use super::Refusal;
use crate::sheet::Choice;
use std::collections::BTreeSet;

/// The one answer among `offered` which `text` means.
///
/// A full spelling stands before a beginning, a beginning before a word in the midst: so `row end` is not in doubt
/// because another answer is called `row end against a wall`, and `breaker` need not be `inverse time breaker`.
pub(super) fn one(text: &str, offered: &'static [Choice]) -> Result<Choice, Refusal> {
    let typed = plain(text);
    let fitting_by = |fits: fn(&str, &str) -> bool| -> Vec<Choice> {
        let spelt_so = |choice: &&Choice| {
            choice_spellings(**choice)
                .iter()
                .any(|spelling| fits(spelling, &typed))
        };
        offered.iter().filter(spelt_so).copied().collect()
    };
    let ways: [fn(&str, &str) -> bool; 3] = [
        |spelling, typed| spelling == typed,
        |spelling, typed| spelling.starts_with(typed),
        |spelling, typed| spelling.contains(&format!(" {typed}")),
    ];
    let mut fitting = Vec::new();
    if !typed.is_empty() {
        for way in ways {
            fitting = fitting_by(way);
            if !fitting.is_empty() {
                break;
            }
        }
    }
    match fitting.as_slice() {
        [] => Err(Refusal::NotOffered {
            text: text.to_owned(),
            offered,
        }),
        [choice] => Ok(*choice),
        _ => Err(Refusal::SeveralFit {
            text: text.to_owned(),
            fitting,
        }),
    }
}

/// The answers which `text` lists, parted by commas, semicolons, plus signs or `and`.
pub(super) fn several(text: &str, offered: &'static [Choice]) -> Result<BTreeSet<Choice>, Refusal> {
    let chosen: BTreeSet<Choice> = text
        .split([',', ';', '+'])
        .flat_map(parted_by_and)
        .filter(|part| !part.is_empty())
        .map(|part| one(&part, offered))
        .collect::<Result<_, _>>()?;
    if chosen.is_empty() {
        return Err(Refusal::NotOffered {
            text: text.to_owned(),
            offered,
        });
    }
    Ok(chosen)
}

/// The parts of `text` between words `and`, whatever their case.
fn parted_by_and(text: &str) -> Vec<String> {
    let words: Vec<&str> = text.split_whitespace().collect();
    words
        .split(|word| word.eq_ignore_ascii_case("and"))
        .map(|part| part.join(" "))
        .collect()
}

/// Small letters and digits with single blanks between words; apostrophes join, all else parts.
fn plain(text: &str) -> String {
    let letters: String = text
        .to_lowercase()
        .chars()
        .filter(|part| !matches!(part, '\'' | '’'))
        .map(|part| if part.is_alphanumeric() { part } else { ' ' })
        .collect();
    let words: Vec<&str> = letters.split_whitespace().collect();
    words.join(" ")
}

/// How `choice` may be written, in small letters with single blanks, the usual spelling first.
pub const fn choice_spellings(choice: Choice) -> &'static [&'static str] {
    match choice {
        Choice::Nec => &["nec"],
        Choice::Nec2023 => &["2023", "nec 2023"],
        Choice::UsCustomary => &["us", "us customary", "imperial"],
        Choice::Si => &["si", "metric"],
        Choice::Nameplate => &["nameplate", "from the nameplate", "name plate"],
        Choice::MeasuredImpedance => &["measured"],
        Choice::Yes => &["yes"],
        Choice::No => &["no", "none"],
        Choice::Together => &["together", "runs together", "running"],
        Choice::Standby => &["standby", "stands by", "stand by"],
        Choice::Inside => &["inside", "inside the enclosure", "in the enclosure"],
        Choice::Field => &["field", "in the field"],
        Choice::Copper => &["copper", "cu"],
        Choice::Aluminium => &["aluminium", "aluminum", "al"],
        Choice::SteelConduit => &["steel", "steel conduit"],
        Choice::PvcConduit => &["pvc", "pvc conduit"],
        Choice::AluminiumConduit => &[
            "aluminium",
            "aluminium conduit",
            "aluminum",
            "aluminum conduit",
        ],
        Choice::Insulation60 => &["60", "60 c", "60c", "60 c insulation"],
        Choice::Insulation75 => &["75", "75 c", "75c", "75 c insulation"],
        Choice::Insulation90 => &["90", "90 c", "90c", "90 c insulation"],
        Choice::Unmarked => &["unmarked", "not marked", "no mark"],
        Choice::Marked60 => &["60", "60 c", "60c", "marked 60 c", "marked 60c"],
        Choice::Marked75 => &["75", "75 c", "75c", "marked 75 c", "marked 75c"],
        Choice::TimeDelayFuse => &["time delay fuse", "td fuse", "dual element fuse"],
        Choice::NontimeDelayFuse => &[
            "nontime delay fuse",
            "non time delay fuse",
            "fast acting fuse",
        ],
        Choice::ClassCcFuse => &["class cc fuse", "cc fuse", "class cc"],
        Choice::InverseTimeBreaker => &["inverse time breaker", "circuit breaker", "cb"],
        Choice::Painted => &["painted", "painted or coated sheet", "coated"],
        Choice::BareMetal => &[
            "bare metal",
            "bare stainless steel or aluminium",
            "stainless steel",
            "aluminium",
            "aluminum",
        ],
        Choice::Plastic => &["plastic"],
        Choice::DoubleWalled => &["double walled", "double wall"],
        Choice::Free => &["free", "alone free on all sides", "free standing"],
        Choice::AgainstWall => &["against a wall", "alone against a wall", "against wall"],
        Choice::RowEnd => &["row end", "at the end of a free standing row"],
        Choice::WallRowEnd => &[
            "row end against a wall",
            "at the end of a row against a wall",
        ],
        Choice::RowMiddle => &["row middle", "within a free standing row"],
        Choice::WallRowMiddle => &["row middle against a wall", "within a row against a wall"],
        Choice::WallRowMiddleCovered => &[
            "row middle against a wall top covered",
            "within a row against a wall top covered",
        ],
        Choice::Indoors => &["indoors", "indoor", "inside"],
        Choice::Outdoors => &["outdoors", "outdoor", "outside"],
        Choice::Sealed => &["sealed", "closed"],
        Choice::FilterFans => &["filter fans", "filter fan"],
        Choice::OfDriveInput => &["drive", "drive input", "the drives rated input current"],
        Choice::OfMotorCurrent => &["motor", "motor current", "the motors full load current"],
        Choice::OfOwnCurrent => &["own current", "a current of its own"],
    }
}
