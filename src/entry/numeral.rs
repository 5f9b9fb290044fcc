//! Numbers as people type them: either decimal mark, digits in groups, any minus, an exponent, a fraction.

/// What a numeral says.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum Value {
    /// One number.
    Sure(f64),
    /// One of two: its marks part thousands, or the first begins the decimals.
    Either([f64; 2]),
}

/// A number in its parts, as typed.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Numeral {
    is_negative: bool,
    /// Digits, `.` and `,`, and [`GAP`] for whatever else parts groups of digits.
    body: String,
    exponent: String,
}

/// Stands for a blank or an apostrophe between digits.
const GAP: char = ' ';

impl Numeral {
    /// The number at the head of `text` and what follows it; `None` where no number stands there.
    pub(super) fn split_from(text: &str) -> Option<(Numeral, &str)> {
        let (is_negative, text) = sign(text);
        let (body, rest) = body(text.trim_start())?;
        let (exponent, rest) = exponent(rest);
        // Digits after all that are no unit: something else stands in the midst of the number.
        if rest
            .trim_start()
            .starts_with(|next: char| next.is_ascii_digit())
        {
            return None;
        }
        let numeral = Numeral {
            is_negative,
            body,
            exponent,
        };
        Some((numeral, rest))
    }

    /// The digits, where there is nothing else but gaps between proper groups and a plus.
    pub(super) fn whole_digits(&self) -> Option<String> {
        let is_whole = !self.is_negative && self.exponent.is_empty();
        if is_whole { joined(&self.body) } else { None }
    }

    /// What the numeral says; `None` where its marks make no sense.
    pub(super) fn value(&self) -> Option<Value> {
        let marks: Vec<char> = self.body.chars().filter(|part| is_mark(*part)).collect();
        match marks.as_slice() {
            [] => Some(Value::Sure(self.number(&joined(&self.body)?, ""))),
            [mark] => {
                let (whole, decimals) = self.body.split_once(*mark)?;
                self.value_with_mark(*mark, whole, decimals)
            }
            [.., last] => self.value_with_marks(*last),
        }
    }

    fn value_with_mark(&self, mark: char, whole: &str, decimals: &str) -> Option<Value> {
        if decimals.contains(GAP) {
            return None;
        }
        let digits = joined(whole)?;
        let sure = self.number(&digits, decimals);
        // A comma is a decimal mark to most of the world, and `3,900` is three thousand nine hundred feet to the people
        // for whom feet are the unit of the sheet. Both type exactly this, so neither reading is taken. A point is no
        // thousands mark where feet are typed, and gaps elsewhere show how this person parts thousands.
        let could_part_thousands = mark == ','
            && decimals.len() == 3
            && (1..=3).contains(&whole.len())
            && !whole.starts_with('0');
        Some(if could_part_thousands {
            Value::Either([self.number(&format!("{digits}{decimals}"), ""), sure])
        } else {
            Value::Sure(sure)
        })
    }

    /// Two marks or more: `1,234.5`, `1.234,5`, `1,234,567`. One of them may be a slip, so none is believed.
    fn value_with_marks(&self, last: char) -> Option<Value> {
        let (head, tail) = self.body.rsplit_once(last)?;
        let is_one_kind = !head.chars().any(|part| is_mark(part) && part != last);
        let is_last_alone = !head.contains(last);
        let (groups, decimals) = if is_one_kind {
            (self.body.as_str(), "")
        } else if is_last_alone {
            (head, tail)
        } else {
            return None;
        };
        if decimals.contains(GAP) {
            return None;
        }
        let as_thousands = grouped(groups.split(is_mark))?;
        let (whole, after) = self.body.split_once(is_mark)?;
        let as_decimals: String = after.chars().filter(|part| !is_mark(*part)).collect();
        Some(Value::Either([
            self.number(&as_thousands, decimals),
            self.number(whole, &as_decimals),
        ]))
    }

    /// The number of these digits; infinite where the exponent is beyond any double.
    fn number(&self, whole: &str, decimals: &str) -> f64 {
        let sign = if self.is_negative { "-" } else { "" };
        let exponent = if self.exponent.is_empty() {
            "0"
        } else {
            &self.exponent
        };
        // Only digits come here, so this always parses; should it not, the range check refuses the infinity.
        let number = format!("{sign}0{whole}.{decimals}0e{exponent}")
            .parse()
            .unwrap_or(f64::INFINITY);
        // Nought has no sign here: `-0` and `0` are one entry.
        number + 0.0
    }
}

/// `1/2`, `7 1/2` or `7-1/2` at the head of `text`, and what follows it.
pub(super) fn fraction(text: &str) -> Option<(f64, &str)> {
    let (first, rest) = digits(text)?;
    let (whole, above, rest) = match rest.strip_prefix('/') {
        Some(rest) => (0.0, first, rest),
        None => {
            let rest = rest.strip_prefix(|next| is_blank(next) || next == '-')?;
            let (above, rest) = digits(rest)?;
            (first, above, rest.strip_prefix('/')?)
        }
    };
    let (below, rest) = digits(rest)?;
    // More than the whole, or a part of nothing, is a slip: `1/0` is a wire.
    if above < below {
        Some((whole + above / below, rest))
    } else {
        None
    }
}

/// A short run of digits as a number, and what follows it.
fn digits(text: &str) -> Option<(f64, &str)> {
    let end = text.bytes().take_while(u8::is_ascii_digit).count();
    let (digits, rest) = text.split_at_checked(end)?;
    Some((f64::from(digits.parse::<u16>().ok()?), rest))
}

fn sign(text: &str) -> (bool, &str) {
    match text.strip_prefix(['-', '\u{2212}']) {
        Some(rest) => (true, rest),
        None => (false, text.strip_prefix('+').unwrap_or(text)),
    }
}

/// Digits and marks at the head of `text`, with at least one digit, and what follows them.
fn body(text: &str) -> Option<(String, &str)> {
    let mut body = String::new();
    let mut rest = text;
    while let Some(next) = rest.chars().next() {
        let after = rest.get(next.len_utf8()..).unwrap_or_default();
        let joins_digits = body.ends_with(|last: char| last.is_ascii_digit())
            && after.starts_with(|next: char| next.is_ascii_digit());
        if next.is_ascii_digit() || is_mark(next) {
            body.push(next);
        } else if joins_digits && (is_blank(next) || is_apostrophe(next)) {
            body.push(GAP);
        } else {
            break;
        }
        rest = after;
    }
    let has_digit = body.contains(|part: char| part.is_ascii_digit());
    has_digit.then_some((body, rest))
}

/// `e3` or `E-3` at the head of `text`, and what follows it. An `e` without digits begins a unit.
fn exponent(text: &str) -> (String, &str) {
    let none = (String::new(), text);
    let Some(after) = text.strip_prefix(['e', 'E']) else {
        return none;
    };
    let (is_negative, after) = sign(after);
    let end = after.bytes().take_while(u8::is_ascii_digit).count();
    match after.split_at_checked(end) {
        Some((digits, rest)) if !digits.is_empty() => {
            let sign = if is_negative { "-" } else { "" };
            (format!("{sign}{digits}"), rest)
        }
        _ => none,
    }
}

/// The digits of a body without marks; `None` where its groups are none of thousands.
fn joined(body: &str) -> Option<String> {
    if body.contains(is_mark) {
        return None;
    }
    if body.contains(GAP) {
        grouped(body.split(GAP))
    } else {
        Some(body.to_owned())
    }
}

/// The digits of groups of thousands: up to three digits, then three each.
fn grouped<'a>(groups: impl Iterator<Item = &'a str>) -> Option<String> {
    let mut digits = String::new();
    for (position, group) in groups.enumerate() {
        let is_group = group.bytes().all(|digit| digit.is_ascii_digit());
        let fits = match position {
            0 => (1..=3).contains(&group.len()),
            _ => group.len() == 3,
        };
        if !(is_group && fits) {
            return None;
        }
        digits.push_str(group);
    }
    Some(digits)
}

fn is_mark(part: char) -> bool {
    matches!(part, '.' | ',')
}

/// Blanks which part groups of digits: also those which keep a number on one line, and narrow ones.
fn is_blank(part: char) -> bool {
    matches!(part, ' ' | '\u{a0}' | '\u{2009}' | '\u{202f}')
}

fn is_apostrophe(part: char) -> bool {
    matches!(part, '\'' | '\u{2019}')
}
