//! What a field holds: text on the page, a value in the file. Which value a kind of field has in the file is
//! said here; how its numbers are read and written is left to `units`.

use crate::units::pairs::{read_pairs, write_pairs};
use crate::units::polynomial::{is_polynomial, read_polynomial, write_polynomial};
use crate::units::quantity::{self, Kind, System};
use serde_json::{Value, json};

/// A kind of field.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Entry {
    /// A number, plain or with a spread.
    Quantity(Kind),
    /// A property: a number, a table or a polynomial over temperature.
    Property(Kind),
    /// Values over time, under this key.
    OverTime(Kind, &'static str),
    /// Temperatures at places.
    Profile,
}

impl Entry {
    /// The kind that the page names so: `length`, `density-property`, `temperature-table`, `profile`.
    fn named(word: &str) -> Option<Self> {
        Some(match word {
            "profile" => Self::Profile,
            "temperature-table" => Self::OverTime(Kind::Temperature, "values_c"),
            "heat_flux-table" => Self::OverTime(Kind::HeatFlux, "values_w_per_m2"),
            _ => match word.strip_suffix("-property") {
                Some(kind) => Self::Property(Kind::named(kind)?),
                None => Self::Quantity(Kind::named(word)?),
            },
        })
    }
}

/// The value of the file that a text says.
///
/// # Errors
/// One sentence that says why the text could not be read.
pub fn read(text: &str, kind: &str, system: System) -> Result<Value, String> {
    match Entry::named(kind).ok_or_else(|| format!("no field is of the kind {kind}"))? {
        Entry::Property(kind) if text.contains(':') => {
            let (at, values) = columns(text, Kind::Temperature, kind, system)?;
            Ok(json!({"at_c": at, "values": values}))
        }
        Entry::Property(_) if is_polynomial(text) => {
            let (coefficients, from, to) = read_polynomial(text)?;
            Ok(json!({"polynomial_in_c": coefficients, "from_c": from, "to_c": to}))
        }
        Entry::Quantity(kind) | Entry::Property(kind) => quantity(text, kind, system),
        Entry::OverTime(kind, key) => {
            let (at, values) = columns(text, Kind::Duration, kind, system)?;
            Ok(json!({"at_s": at, key: values}))
        }
        Entry::Profile => {
            let pairs = read_pairs(text, Kind::Length, Kind::Temperature, system)?;
            let point = |(place, temperature)| json!({"from_inside_m": place, "temperature_c": temperature});
            Ok(pairs.into_iter().map(point).collect())
        }
    }
}

fn quantity(text: &str, kind: Kind, system: System) -> Result<Value, String> {
    let written = quantity::read(text, kind, system)?;
    Ok(match (written.low, written.high) {
        (None, None) => json!(written.value),
        (low, high) => json!({
            "value": written.value,
            "low": low.unwrap_or(written.value),
            "high": high.unwrap_or(written.value),
        }),
    })
}

fn columns(text: &str, at: Kind, value: Kind, system: System) -> Result<(Vec<f64>, Vec<f64>), String> {
    Ok(read_pairs(text, at, value, system)?.into_iter().unzip())
}

/// A value of the file as text; empty for a value that such a field cannot have.
pub fn write(value: &Value, kind: &str, system: System) -> String {
    let Some(entry) = Entry::named(kind) else { return String::new() };
    let text = match entry {
        Entry::Quantity(kind) => number(value, kind, system),
        Entry::Property(kind) => number(value, kind, system)
            .or_else(|| pairs(value, "at_c", Kind::Temperature, "values", kind, system))
            .or_else(|| polynomial(value)),
        Entry::OverTime(kind, key) => pairs(value, "at_s", Kind::Duration, key, kind, system),
        Entry::Profile => profile(value, system),
    };
    text.unwrap_or_default()
}

/// Exactly in metric units; rounded for showing where it was converted.
fn number(value: &Value, kind: Kind, system: System) -> Option<String> {
    let write = match system {
        System::Metric => quantity::write,
        System::Us => quantity::show,
    };
    if let Some(value) = value.as_f64() {
        return Some(write(value, None, None, kind, system));
    }
    let part = |key: &str| value.get(key).and_then(Value::as_f64);
    Some(write(part("value")?, Some(part("low")?), Some(part("high")?), kind, system))
}

fn numbers(value: &Value, key: &str) -> Option<Vec<f64>> {
    value.get(key)?.as_array()?.iter().map(Value::as_f64).collect()
}

fn pairs(value: &Value, at: &str, at_kind: Kind, key: &str, kind: Kind, system: System) -> Option<String> {
    let (at, values) = (numbers(value, at)?, numbers(value, key)?);
    let pairs: Vec<(f64, f64)> = at.into_iter().zip(values).collect();
    Some(write_pairs(&pairs, at_kind, kind, system))
}

fn polynomial(value: &Value) -> Option<String> {
    let end = |key: &str| value.get(key).and_then(Value::as_f64);
    Some(write_polynomial(&numbers(value, "polynomial_in_c")?, end("from_c")?, end("to_c")?))
}

fn profile(value: &Value, system: System) -> Option<String> {
    let part = |point: &Value, key: &str| point.get(key).and_then(Value::as_f64);
    let point = |point: &Value| Some((part(point, "from_inside_m")?, part(point, "temperature_c")?));
    let pairs: Option<Vec<(f64, f64)>> = value.as_array()?.iter().map(point).collect();
    Some(write_pairs(&pairs?, Kind::Length, Kind::Temperature, system))
}

/// The text one step of its number up or down; none where there is no one number to step.
pub fn step(text: &str, kind: &str, system: System, up: bool, large: bool) -> Option<String> {
    match Entry::named(kind)? {
        Entry::Quantity(kind) | Entry::Property(kind) => quantity::step(text, kind, system, up, large),
        Entry::OverTime(..) | Entry::Profile => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn comes_back(value: &Value, kind: &str) {
        let text = write(value, kind, System::Metric);
        assert_eq!(read(&text, kind, System::Metric).as_ref(), Ok(value), "{text}");
    }

    #[test]
    fn every_kind_of_value_is_written_as_it_is_read() {
        comes_back(&json!(0.4), "length");
        comes_back(&json!({"value": 8.0, "low": 6.0, "high": 12.0}), "film");
        comes_back(&json!(0.04), "conductivity-property");
        comes_back(&json!({"at_c": [20.0, 200.0], "values": [0.9, 1.0]}), "conductivity-property");
        let polynomial = json!({"polynomial_in_c": [4200.0, -0.5, 0.01], "from_c": 0.0, "to_c": 100.0});
        comes_back(&polynomial, "heat_capacity-property");
        comes_back(&json!({"at_s": [0.0, 21_600.0], "values_c": [18.0, 12.0]}), "temperature-table");
        comes_back(&json!({"at_s": [0.0, 60.0], "values_w_per_m2": [500.0, 0.0]}), "heat_flux-table");
        comes_back(&json!([{"from_inside_m": 0.0, "temperature_c": 92.0}]), "profile");
    }

    #[test]
    fn a_value_of_another_kind_is_written_as_nothing() {
        assert_eq!(write(&json!("8 mm"), "length", System::Metric), "");
        assert_eq!(write(&json!({"at_s": [0.0]}), "temperature-table", System::Metric), "");
    }

    #[test]
    fn a_number_steps_and_a_table_does_not() {
        let up = |text, kind| step(text, kind, System::Metric, true, false);
        assert!(up("400 mm", "length").is_some_and(|text| text.ends_with(" mm") && text.as_str() > "400 mm"));
        assert_eq!(up("0 h: 18 °C; 6 h: 12 °C", "temperature-table"), None);
    }

    #[test]
    fn a_text_that_says_nothing_is_refused_with_an_example() {
        assert!(read("thick", "length", System::Metric).is_err_and(|words| words.contains("400 mm")));
    }
}
