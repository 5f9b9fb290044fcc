//! JSON as a plain tree which keeps repeated names, so that they can be refused, and tools to take it apart by name.

use super::{Damage, Expected, Fault};
use serde::de::{DeserializeSeed, Deserializer, Error, MapAccess, SeqAccess, Visitor};
use serde_json::Number;
use serde_json::error::Category;
use std::cell::Cell;
use std::collections::BTreeMap;
use std::fmt;

/// Any JSON value. Names of an object stand in the order of the text, repeated ones too.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Json {
    /// `null`, `true` or `false`: no sheet has any.
    Other,
    /// A number.
    Number(Number),
    /// A text.
    Text(String),
    /// A list.
    List(Vec<Json>),
    /// An object.
    Object(Vec<(String, Json)>),
}

/// Why a text is no tree.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Unread {
    /// Not well-formed.
    NotJson { line: usize, column: usize },
    /// More values than allowed.
    TooManyValues,
}

/// The tree of `text`, which may hold `most` values. Depth is bounded by the library, at 128.
pub(super) fn parse(text: &str, most: usize) -> Result<Json, Unread> {
    let left = Cell::new(most);
    let mut source = serde_json::Deserializer::from_str(text);
    TreeSeed { left: &left }
        .deserialize(&mut source)
        .and_then(|json| source.end().map(|()| json))
        .map_err(|error| match error.classify() {
            // The only complaint of `TreeSeed` itself.
            Category::Data => Unread::TooManyValues,
            _ => Unread::NotJson {
                line: error.line().max(1),
                column: error.column().max(1),
            },
        })
}

impl Json {
    /// The first value under `name`, of an object.
    pub(super) fn at(&self, name: &str) -> Option<&Json> {
        match self {
            Json::Object(members) => members
                .iter()
                .find(|(known, _)| known == name)
                .map(|(_, value)| value),
            _ => None,
        }
    }

    pub(super) fn as_text(&self) -> Option<&str> {
        match self {
            Json::Text(text) => Some(text),
            _ => None,
        }
    }

    /// A whole number which is not negative; `2.0` is none.
    pub(super) fn as_whole(&self) -> Option<u64> {
        match self {
            Json::Number(number) => number.as_u64(),
            _ => None,
        }
    }

    pub(super) fn text(self) -> Result<String, Damage> {
        match self {
            Json::Text(text) => Ok(text),
            _ => Err(wrong_type(Expected::Text)),
        }
    }

    pub(super) fn number(self) -> Result<f64, Damage> {
        match &self {
            Json::Number(number) => number.as_f64(),
            _ => None,
        }
        .ok_or_else(|| wrong_type(Expected::Number))
    }

    pub(super) fn whole(self) -> Result<u32, Damage> {
        let whole = self
            .as_whole()
            .ok_or_else(|| wrong_type(Expected::WholeNumber))?;
        u32::try_from(whole).map_err(|_| Damage::here(Fault::TooLargeNumber { most: u32::MAX }))
    }

    /// Reads each item of a list of at most `most`, with its position in the path of what is wrong with it.
    pub(super) fn items<T>(
        self,
        most: usize,
        mut read: impl FnMut(Json) -> Result<T, Damage>,
    ) -> Result<Vec<T>, Damage> {
        let Json::List(items) = self else {
            return Err(wrong_type(Expected::List));
        };
        if items.len() > most {
            return Err(Damage::here(Fault::TooMany { most }));
        }
        items
            .into_iter()
            .enumerate()
            .map(|(position, item)| {
                read(item).map_err(|damage| damage.within(&format!("[{position}]")))
            })
            .collect()
    }

    /// The members of an object, none repeated.
    pub(super) fn members(self) -> Result<Members, Damage> {
        let Json::Object(pairs) = self else {
            return Err(wrong_type(Expected::Object));
        };
        let mut members = BTreeMap::new();
        for (name, value) in pairs {
            if members.contains_key(&name) {
                return Err(Damage::here(Fault::Repeated).within(&name));
            }
            members.insert(name, value);
        }
        Ok(Members(members))
    }
}

fn wrong_type(expected: Expected) -> Damage {
    Damage::here(Fault::WrongType { expected })
}

/// The members of an object which were not yet taken.
pub(super) struct Members(BTreeMap<String, Json>);

impl Members {
    /// Takes the member `name`, which must be there, and reads it.
    pub(super) fn take<T>(
        &mut self,
        name: &str,
        read: impl FnOnce(Json) -> Result<T, Damage>,
    ) -> Result<T, Damage> {
        self.take_if_there(name, read)?
            .ok_or_else(|| Damage::here(Fault::Missing).within(name))
    }

    /// Takes the member `name` where it is there, and reads it.
    pub(super) fn take_if_there<T>(
        &mut self,
        name: &str,
        read: impl FnOnce(Json) -> Result<T, Damage>,
    ) -> Result<Option<T>, Damage> {
        self.0
            .remove(name)
            .map(|value| read(value).map_err(|damage| damage.within(name)))
            .transpose()
    }

    /// Says that nothing may be left.
    pub(super) fn end(self) -> Result<(), Damage> {
        match self.0.into_keys().next() {
            Some(name) => Err(Damage::here(Fault::UnknownName).within(&name)),
            None => Ok(()),
        }
    }

    /// All that is left.
    pub(super) fn rest(self) -> impl Iterator<Item = (String, Json)> {
        self.0.into_iter()
    }
}

impl Damage {
    /// A fault at the place which is being read.
    pub(super) fn here(fault: Fault) -> Damage {
        Damage {
            path: String::new(),
            fault,
        }
    }

    /// The same, seen from one level further out.
    pub(super) fn within(self, outer: &str) -> Damage {
        let joint = if self.path.is_empty() || self.path.starts_with('[') {
            ""
        } else {
            "."
        };
        Damage {
            path: format!("{}{joint}{}", excerpt(outer), self.path),
            fault: self.fault,
        }
    }
}

/// As much of a strange name as helps to find it, so that a message cannot grow with the file.
pub(super) fn excerpt(text: &str) -> String {
    match text.char_indices().nth(60) {
        Some((end, _)) => format!("{}…", text.get(..end).unwrap_or_default()),
        None => text.to_owned(),
    }
}

/// Builds a tree and counts its values down.
#[derive(Clone, Copy)]
struct TreeSeed<'a> {
    left: &'a Cell<usize>,
}

impl<'de> DeserializeSeed<'de> for TreeSeed<'_> {
    type Value = Json;

    fn deserialize<D: Deserializer<'de>>(self, source: D) -> Result<Json, D::Error> {
        match self.left.get().checked_sub(1) {
            Some(left) => self.left.set(left),
            None => return Err(D::Error::custom("")),
        }
        source.deserialize_any(self)
    }
}

impl<'de> Visitor<'de> for TreeSeed<'_> {
    type Value = Json;

    fn expecting(&self, formatter: &mut fmt::Formatter) -> fmt::Result {
        formatter.write_str("JSON")
    }

    fn visit_unit<E>(self) -> Result<Json, E> {
        Ok(Json::Other)
    }

    fn visit_bool<E>(self, _: bool) -> Result<Json, E> {
        Ok(Json::Other)
    }

    fn visit_u64<E>(self, number: u64) -> Result<Json, E> {
        Ok(Json::Number(number.into()))
    }

    fn visit_i64<E>(self, number: i64) -> Result<Json, E> {
        Ok(Json::Number(number.into()))
    }

    fn visit_f64<E>(self, number: f64) -> Result<Json, E> {
        // The library refuses numbers beyond the range of doubles before it comes here.
        Ok(Number::from_f64(number).map_or(Json::Other, Json::Number))
    }

    fn visit_str<E>(self, text: &str) -> Result<Json, E> {
        Ok(Json::Text(text.to_owned()))
    }

    fn visit_string<E>(self, text: String) -> Result<Json, E> {
        Ok(Json::Text(text))
    }

    fn visit_seq<A: SeqAccess<'de>>(self, mut source: A) -> Result<Json, A::Error> {
        let mut items = Vec::new();
        while let Some(item) = source.next_element_seed(self)? {
            items.push(item);
        }
        Ok(Json::List(items))
    }

    fn visit_map<A: MapAccess<'de>>(self, mut source: A) -> Result<Json, A::Error> {
        let mut members = Vec::new();
        while let Some(name) = source.next_key()? {
            members.push((name, source.next_value_seed(self)?));
        }
        Ok(Json::Object(members))
    }
}
