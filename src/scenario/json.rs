//! JSON text to a value: bounded before work starts, duplicate keys found.

use super::limits::{FILE_BYTES, NESTING};
use crate::problem::{Problem, TOLD, Trouble};
use serde::de::{DeserializeSeed, Error, MapAccess, SeqAccess, Visitor};
use serde_json::{Map, Value};
use std::cell::RefCell;
use std::fmt;

/// Reads a JSON document; with it, the keys that stand twice in one object (the first of them is read).
///
/// # Errors
/// Too large, no JSON (with line and column), or nested too deep.
pub fn parse(text: &str) -> Result<(Value, Vec<Problem>), Problem> {
    if text.len() > FILE_BYTES {
        let trouble = Trouble::TooMany { what: "bytes", found: text.len(), most: FILE_BYTES };
        return Err(Problem::error("", trouble));
    }
    let text = text.strip_prefix('\u{feff}').unwrap_or(text);
    let repeated = RefCell::new(Vec::new());
    let mut reader = serde_json::Deserializer::from_str(text);
    let seed = Seed { place: Place::Top, depth: 0, repeated: &repeated };
    let value = seed.deserialize(&mut reader).and_then(|value| reader.end().map(|()| value));
    match value {
        Ok(value) => Ok((value, repeated.into_inner())),
        Err(error) => {
            let said = error.to_string();
            let detail = said.split(" at line ").next().unwrap_or(&said).to_owned();
            let (line, column) = (error.line().max(1), letters(text, error.line(), error.column()));
            Err(Problem::error("", Trouble::NotJson { line, column, detail }))
        }
    }
}

/// The column in letters, from 1; the parser counts bytes.
fn letters(text: &str, line: usize, bytes: usize) -> usize {
    let line = text.split('\n').nth(line.saturating_sub(1)).unwrap_or("");
    line.char_indices().take_while(|(at, _)| *at < bytes).count().max(1)
}

/// A key as a part of a JSON Pointer (RFC 6901, section 3).
pub fn pointer_part(key: &str) -> String {
    key.replace('~', "~0").replace('/', "~1")
}

/// Where a value stands. Written out only when it is told: a long key may have very many values in it.
#[derive(Clone, Copy)]
enum Place<'a> {
    Top,
    Key(&'a Place<'a>, &'a str),
    Index(&'a Place<'a>, usize),
}

impl Place<'_> {
    fn pointer(&self) -> String {
        match self {
            Self::Top => String::new(),
            Self::Key(parent, key) => format!("{}/{}", parent.pointer(), pointer_part(key)),
            Self::Index(parent, index) => format!("{}/{index}", parent.pointer()),
        }
    }
}

/// Reads one value and knows where it stands.
#[derive(Clone, Copy)]
struct Seed<'a> {
    place: Place<'a>,
    depth: usize,
    repeated: &'a RefCell<Vec<Problem>>,
}

impl<'a> Seed<'a> {
    fn inner<'b>(&'b self, place: Place<'b>) -> Seed<'b>
    where
        'a: 'b,
    {
        Seed { place, depth: self.depth + 1, repeated: self.repeated }
    }

    fn deeper<E: Error>(&self) -> Result<(), E> {
        if self.depth < NESTING {
            return Ok(());
        }
        Err(E::custom(format!("lists and objects nest deeper than {NESTING}")))
    }

    fn found_again(&self, key: &str) {
        let mut repeated = self.repeated.borrow_mut();
        // Others are told once these are mended.
        if repeated.len() < TOLD {
            let path = Place::Key(&self.place, key).pointer();
            repeated.push(Problem::error(path, Trouble::Repeated { key: key.to_owned() }));
        }
    }
}

impl<'de> DeserializeSeed<'de> for Seed<'_> {
    type Value = Value;
    fn deserialize<D: serde::Deserializer<'de>>(self, from: D) -> Result<Value, D::Error> {
        from.deserialize_any(self)
    }
}

impl<'de> Visitor<'de> for Seed<'_> {
    type Value = Value;

    fn expecting(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(f, "a JSON value")
    }
    fn visit_unit<E>(self) -> Result<Value, E> {
        Ok(Value::Null)
    }
    fn visit_bool<E>(self, value: bool) -> Result<Value, E> {
        Ok(Value::Bool(value))
    }
    fn visit_i64<E>(self, value: i64) -> Result<Value, E> {
        Ok(value.into())
    }
    fn visit_u64<E>(self, value: u64) -> Result<Value, E> {
        Ok(value.into())
    }
    fn visit_f64<E>(self, value: f64) -> Result<Value, E> {
        Ok(value.into())
    }
    fn visit_str<E>(self, value: &str) -> Result<Value, E> {
        Ok(Value::String(value.to_owned()))
    }

    fn visit_seq<A: SeqAccess<'de>>(self, mut from: A) -> Result<Value, A::Error> {
        self.deeper()?;
        let mut list = Vec::new();
        while let Some(value) = from.next_element_seed(self.inner(Place::Index(&self.place, list.len())))? {
            list.push(value);
        }
        Ok(Value::Array(list))
    }

    fn visit_map<A: MapAccess<'de>>(self, mut from: A) -> Result<Value, A::Error> {
        self.deeper()?;
        let mut object = Map::new();
        while let Some(key) = from.next_key::<String>()? {
            let value = from.next_value_seed(self.inner(Place::Key(&self.place, &key)))?;
            if object.contains_key(&key) {
                self.found_again(&key);
            } else {
                object.insert(key, value);
            }
        }
        Ok(Value::Object(object))
    }
}

#[cfg(test)]
mod tests {
    use super::parse;
    use crate::problem::Trouble;

    #[test]
    fn a_column_counts_letters_and_not_bytes() {
        let problem = parse("{\n\"°°\": x}").expect_err("x is no value");
        let Trouble::NotJson { line, column, .. } = problem.trouble else { panic!("{problem}") };
        assert_eq!((line, column), (2, 7));
    }

    #[test]
    fn a_key_that_stands_twice_is_told_and_the_first_is_read() {
        let (value, repeated) = parse(r#"{"a/b": [{"k": 1, "k": 2}]}"#).expect("it is JSON");
        assert_eq!(value["a/b"][0]["k"], 1);
        let places: Vec<&str> = repeated.iter().map(|problem| problem.path.as_str()).collect();
        assert_eq!(places, ["/a~1b/0/k"]);
    }
}
