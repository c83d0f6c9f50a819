//! JSON text to a value: bounded before work starts, duplicate keys found.

use super::limits::{FILE_BYTES, NESTING};
use crate::problem::{Problem, Trouble};
use serde::de::{DeserializeSeed, Error, MapAccess, SeqAccess, Visitor};
use serde_json::{Map, Value};
use std::cell::RefCell;
use std::fmt;

/// Reads a JSON document.
///
/// # Errors
/// Too large, no JSON (with line and column), nested too deep, or the same key twice in one object.
pub fn parse(text: &str) -> Result<Value, Vec<Problem>> {
    if text.len() > FILE_BYTES {
        let trouble = Trouble::TooMany { what: "bytes", found: text.len(), most: FILE_BYTES };
        return Err(vec![Problem::error("", trouble)]);
    }
    let repeated = RefCell::new(Vec::new());
    let mut reader = serde_json::Deserializer::from_str(text.strip_prefix('\u{feff}').unwrap_or(text));
    let seed = Seed { path: String::new(), depth: 0, repeated: &repeated };
    let value = seed.deserialize(&mut reader).and_then(|value| reader.end().map(|()| value));
    match value {
        Ok(value) if repeated.borrow().is_empty() => Ok(value),
        Ok(_) => Err(repeated.into_inner()),
        Err(error) => {
            let said = error.to_string();
            let detail = said.split(" at line ").next().unwrap_or(&said).to_owned();
            let trouble = Trouble::NotJson { line: error.line(), column: error.column(), detail };
            Err(vec![Problem::error("", trouble)])
        }
    }
}

/// A key as a part of a JSON Pointer (RFC 6901, section 3).
pub fn pointer_part(key: &str) -> String {
    key.replace('~', "~0").replace('/', "~1")
}

/// Reads one value and knows where it stands.
struct Seed<'a> {
    path: String,
    depth: usize,
    repeated: &'a RefCell<Vec<Problem>>,
}

impl Seed<'_> {
    fn inner(&self, part: &str) -> Self {
        Self { path: format!("{}/{part}", self.path), depth: self.depth + 1, repeated: self.repeated }
    }

    fn deeper<E: Error>(&self) -> Result<(), E> {
        if self.depth < NESTING {
            return Ok(());
        }
        Err(E::custom(format!("lists and objects nest deeper than {NESTING}")))
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
        while let Some(value) = from.next_element_seed(self.inner(&list.len().to_string()))? {
            list.push(value);
        }
        Ok(Value::Array(list))
    }

    fn visit_map<A: MapAccess<'de>>(self, mut from: A) -> Result<Value, A::Error> {
        self.deeper()?;
        let mut object = Map::new();
        while let Some(key) = from.next_key::<String>()? {
            let value = from.next_value_seed(self.inner(&pointer_part(&key)))?;
            if object.insert(key.clone(), value).is_some() {
                let problem = Problem::error(self.path.clone(), Trouble::Repeated { key });
                self.repeated.borrow_mut().push(problem);
            }
        }
        Ok(Value::Object(object))
    }
}
