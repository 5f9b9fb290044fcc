//! Printed expressions of rules as they are shown: `sqrt(3) * U * I` as `√3 × U × I`.

use super::numbers::{Rounding, number};

/// A word, a number or a sign of an expression.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Token<'a> {
    Name(&'a str),
    Number(&'a str),
    Sign(char),
}

/// `expression` with mathematical signs, each symbol as `shown` gives it.
pub fn mathematical(expression: &str, shown: impl Fn(&str) -> String) -> String {
    let tokens = squared(&tokens(expression));
    let mut text = String::new();
    let mut rest = tokens.as_slice();
    while let Some((token, after)) = rest.split_first() {
        rest = after;
        match token {
            Token::Name("sqrt") => {
                text.push('√');
                // A root over a single number needs no parentheses.
                if let [
                    Token::Sign('('),
                    Token::Number(radicand),
                    Token::Sign(')'),
                    tail @ ..,
                ] = after
                {
                    text.push_str(radicand);
                    rest = tail;
                }
            }
            Token::Name("pi") => text.push('π'),
            Token::Name(name) => {
                let value = shown(name);
                let is_raised = after.first() == Some(&Token::Sign('^'));
                if value.starts_with('−') || (is_raised && value.contains(' ')) {
                    text.push_str(&format!("({value})"));
                } else {
                    text.push_str(&value);
                }
            }
            Token::Number(digits) => text.push_str(&grouped(digits)),
            Token::Sign('*') => text.push_str(" × "),
            Token::Sign('/') => text.push_str(" / "),
            Token::Sign('+') => text.push_str(" + "),
            Token::Sign('-') => text.push_str(" − "),
            Token::Sign('^') => {
                if let [Token::Number(exponent), tail @ ..] = after {
                    text.push_str(&raised(exponent));
                    rest = tail;
                }
            }
            Token::Sign(sign) => text.push(*sign),
        }
    }
    text
}

/// A symbol as it is shown: Greek letters for their names.
pub fn symbol_shown(symbol: &str) -> String {
    match symbol {
        "cosphi" => "cos φ".to_owned(),
        "sinphi" => "sin φ".to_owned(),
        "dU" => "ΔU".to_owned(),
        "dT" => "ΔT".to_owned(),
        "cp" => "c_p".to_owned(),
        _ => symbol
            .replace("eta", "η")
            .replace("lambda", "λ")
            .replace("rho", "ρ"),
    }
}

fn tokens(expression: &str) -> Vec<Token<'_>> {
    let mut found = Vec::new();
    let mut rest = expression.trim_start();
    while let Some(first) = rest.chars().next() {
        let taken: fn(char) -> bool = if first.is_ascii_digit() {
            |letter| letter.is_ascii_digit() || letter == '.'
        } else {
            |letter| letter.is_alphanumeric() || letter == '_'
        };
        let length = rest
            .find(|letter| !taken(letter))
            .unwrap_or(rest.len())
            .max(first.len_utf8());
        let (word, after) = rest.split_at(length);
        found.push(if first.is_ascii_digit() {
            Token::Number(word)
        } else if first.is_alphabetic() {
            Token::Name(word)
        } else {
            Token::Sign(first)
        });
        rest = after.trim_start();
    }
    found
}

/// A factor written twice in a row as its square.
fn squared<'a>(tokens: &[Token<'a>]) -> Vec<Token<'a>> {
    let mut out: Vec<Token<'a>> = Vec::new();
    let mut rest = tokens;
    while let Some((first, after_first)) = rest.split_first() {
        let follows_division = out.last() == Some(&Token::Sign('/'));
        match twice(rest) {
            Some((factor, after)) if !follows_division => {
                out.extend_from_slice(factor);
                out.push(Token::Sign('^'));
                out.push(Token::Number("2"));
                rest = after;
            }
            _ => {
                out.push(*first);
                rest = after_first;
            }
        }
    }
    out
}

/// The factor at the head of `tokens` and what follows its repetition, where it stands there twice.
fn twice<'a, 'b>(tokens: &'b [Token<'a>]) -> Option<(&'b [Token<'a>], &'b [Token<'a>])> {
    let (factor, after) = tokens.split_at_checked(factor_length(tokens)?)?;
    let second = after.strip_prefix(&[Token::Sign('*')])?;
    let after = second.strip_prefix(factor)?;
    Some((factor, after))
}

/// How many tokens the symbol or the group in parentheses at the head of `tokens` has.
fn factor_length(tokens: &[Token<'_>]) -> Option<usize> {
    match tokens.first()? {
        Token::Name("sqrt" | "pi") | Token::Number(_) => None,
        Token::Name(_) => Some(1),
        Token::Sign('(') => {
            let mut depth = 0_i32;
            for (position, token) in tokens.iter().enumerate() {
                match token {
                    Token::Sign('(') => depth += 1,
                    Token::Sign(')') => depth -= 1,
                    Token::Name(_) | Token::Number(_) | Token::Sign(_) => {}
                }
                if depth == 0 {
                    return Some(position + 1);
                }
            }
            None
        }
        Token::Sign(_) => None,
    }
}

fn grouped(digits: &str) -> String {
    digits.parse().map_or_else(
        |_| digits.to_owned(),
        |value: f64| number(value, Rounding::Exact),
    )
}

fn raised(exponent: &str) -> String {
    match exponent {
        "2" => "²".to_owned(),
        "3" => "³".to_owned(),
        "4" => "⁴".to_owned(),
        other => format!("^{other}"),
    }
}
