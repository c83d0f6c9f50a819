//! A place in the file while it is being read; every problem is written down and reading goes on.

use super::json::pointer_part;
use super::limits::apart;
use super::nearest::nearest;
use super::types::Number;
use crate::problem::{Limit, Problem, Trouble, figure, printable};
use serde_json::{Map, Value};
use std::cell::RefCell;

/// The keys of a number that is known roughly.
pub const SPREAD: &[&str] = &["value", "low", "high"];

/// A value and where it stands.
#[derive(Clone)]
pub struct At<'a> {
    value: &'a Value,
    path: String,
    problems: &'a RefCell<Vec<Problem>>,
}

/// An object whose keys are known.
pub struct Fields<'a> {
    map: &'a Map<String, Value>,
    at: At<'a>,
}

impl<'a> At<'a> {
    /// The whole document.
    pub fn top(value: &'a Value, problems: &'a RefCell<Vec<Problem>>) -> Self {
        Self { value, path: String::new(), problems }
    }

    /// Writes a problem down.
    pub fn problem(&self, trouble: Trouble) {
        self.problems.borrow_mut().push(Problem::error(self.path.clone(), trouble));
    }

    fn inner(&self, value: &'a Value, part: &str) -> Self {
        Self { value, path: format!("{}/{part}", self.path), problems: self.problems }
    }

    fn wrong<T>(&self, expected: &'static str) -> Option<T> {
        self.problem(Trouble::WrongType { found: shown(self.value), expected });
        None
    }

    /// Is it an object with this key?
    pub fn has(&self, key: &str) -> bool {
        self.value.get(key).is_some()
    }

    /// The value of a key of an object, if it is there.
    pub fn member(&self, key: &str) -> Option<Self> {
        self.value.get(key).map(|value| self.inner(value, &pointer_part(key)))
    }

    /// Have two lists the same length? Writes it down where not.
    pub fn same_length(&self, one: &str, length: usize, other: &str, other_length: usize) -> bool {
        if length != other_length {
            let words =
                format!("{one} has {length} entries and {other} has {other_length}; they go in pairs");
            self.problem(Trouble::Contradiction { words });
        }
        length == other_length
    }

    /// Is it an object?
    pub fn is_object(&self) -> bool {
        self.value.is_object()
    }

    /// An object with these keys and no others.
    pub fn fields(&self, expected: &'static str, known: &'static [&'static str]) -> Option<Fields<'a>> {
        let Value::Object(map) = self.value else { return self.wrong(expected) };
        for key in map.keys().filter(|key| !known.contains(&key.as_str())) {
            let nearest = nearest(key, known.iter().copied().filter(|known| !map.contains_key(*known)));
            self.inner(self.value, &pointer_part(key)).problem(Trouble::UnknownKey { nearest, known });
        }
        Some(Fields { map, at: self.clone() })
    }

    /// A list of so many things.
    pub fn list(&self, what: &'static str, least: usize, most: usize) -> Option<Vec<Self>> {
        let Value::Array(list) = self.value else { return self.wrong("a list") };
        if list.len() > most {
            self.problem(Trouble::TooMany { what, found: list.len(), most });
            return None;
        }
        if list.len() < least {
            self.problem(Trouble::TooFew { what, found: list.len(), least });
            return None;
        }
        Some(list.iter().enumerate().map(|(i, value)| self.inner(value, &i.to_string())).collect())
    }

    /// A number within its limits.
    pub fn number(&self, limit: &'static Limit) -> Option<f64> {
        let Some(found) = self.value.as_f64() else { return self.wrong("a number") };
        if limit.holds(found) {
            return Some(found);
        }
        self.problem(Trouble::OutOfRange { limit, found });
        None
    }

    /// A list of numbers within their limits.
    pub fn numbers(
        &self,
        what: &'static str,
        least: usize,
        most: usize,
        limit: &'static Limit,
    ) -> Option<Vec<f64>> {
        let all: Vec<Option<f64>> =
            self.list(what, least, most)?.iter().map(|one| one.number(limit)).collect();
        all.into_iter().collect()
    }

    /// A list of two numbers or more, each above the one before by a step at least.
    pub fn ascending(
        &self,
        what: &'static str,
        most: usize,
        limit: &'static Limit,
        step: f64,
    ) -> Option<Vec<f64>> {
        let all = self.numbers(what, 2, most, limit)?;
        if let Some(i) = all.windows(2).position(|pair| !apart(pair[0], pair[1], step)) {
            let (before, after) = (figure(all[i]), figure(all[i + 1]));
            let words = format!("{after} comes after {before}; {what} must ascend by at least {step}");
            self.inner(self.value, &(i + 1).to_string()).problem(Trouble::Contradiction { words });
            return None;
        }
        Some(all)
    }

    /// A number, plain or with a spread, within its limits.
    pub fn spread(&self, limit: &'static Limit) -> Option<Number> {
        if !self.is_object() {
            return self.number(limit).map(Number::Plain);
        }
        let fields = self.fields("a number", SPREAD)?;
        let part = |key, what| fields.needed(key, what).and_then(|at| at.number(limit));
        let value = part("value", "the likely value");
        let low = part("low", "hardly lower than this");
        let high = part("high", "hardly higher than this");
        let (value, low, high) = (value?, low?, high?);
        if !(low <= value && value <= high) {
            let [low, value, high] = [low, value, high].map(figure);
            let words =
                format!("low {low}, value {value}, high {high}: the value must lie between low and high");
            self.problem(Trouble::Contradiction { words });
            return None;
        }
        Some(Number::Spread { value, low, high })
    }

    /// Text in one line of so many letters at most.
    pub fn line(&self, most: usize) -> Option<String> {
        let text = self.text(most)?;
        if text.chars().any(char::is_control) {
            let words = format!("\"{}\" has control characters in it; letters only", shortened(&text));
            self.problem(Trouble::Contradiction { words });
            return None;
        }
        Some(text)
    }

    /// The same, and not empty.
    pub fn name(&self, most: usize) -> Option<String> {
        let name = self.line(most)?;
        if name.trim().is_empty() {
            self.problem(Trouble::Missing { what: "a name that conditions can refer to".to_owned() });
            return None;
        }
        Some(name)
    }

    /// Text of so many letters at most.
    pub fn text(&self, most: usize) -> Option<String> {
        let Value::String(text) = self.value else { return self.wrong("text in quotes") };
        let found = text.chars().count();
        if found > most {
            self.problem(Trouble::TooMany { what: "letters", found, most });
            return None;
        }
        Some(text.clone())
    }

    /// One of these words.
    pub fn word<T: Copy>(&self, words: &[(&'static str, T)]) -> Option<T> {
        let Value::String(found) = self.value else { return self.wrong("a word in quotes") };
        if let Some((_, meant)) = words.iter().find(|(word, _)| word == found) {
            return Some(*meant);
        }
        let near = nearest(found, words.iter().map(|(word, _)| *word)).map(str::to_owned);
        let allowed = words.iter().map(|(word, _)| (*word).to_owned()).collect();
        self.problem(Trouble::NotOneOf { found: shortened(found), nearest: near, allowed });
        None
    }

    /// True; left out says the contrary.
    pub fn only_true(&self) -> Option<bool> {
        if self.value == &Value::Bool(true) {
            Some(true)
        } else {
            self.wrong("true (leave it out otherwise)")
        }
    }

    /// A whole number from 0 up.
    pub fn whole(&self) -> Option<u64> {
        self.value.as_u64().or_else(|| self.wrong("a whole number from 1 up"))
    }
}

impl<'a> Fields<'a> {
    /// The value of a key, if it is there.
    pub fn get(&self, key: &'static str) -> Option<At<'a>> {
        self.map.get(key).map(|value| self.at.inner(value, key))
    }

    /// The value of a key that must be there.
    pub fn needed(&self, key: &'static str, what: &str) -> Option<At<'a>> {
        let found = self.get(key);
        if found.is_none() {
            self.at.inner(self.at.value, key).problem(Trouble::Missing { what: what.to_owned() });
        }
        found
    }

    /// Where the object stands.
    pub fn at(&self) -> &At<'a> {
        &self.at
    }
}

/// A value as a message shows it: short.
fn shown(value: &Value) -> String {
    match value {
        Value::Null => "null".to_owned(),
        Value::Bool(value) => value.to_string(),
        Value::Number(number) => number.to_string(),
        Value::String(text) => format!("the text \"{}\"", shortened(text)),
        Value::Array(list) => format!("a list of {}", list.len()),
        Value::Object(_) => "an object".to_owned(),
    }
}

fn shortened(text: &str) -> String {
    const MOST: usize = 40;
    if text.chars().count() <= MOST {
        return printable(text);
    }
    printable(text).chars().take(MOST).chain(['…']).collect()
}
