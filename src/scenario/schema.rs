//! The JSON Schema of the file (JSON Schema 2020-12), made from its types and from the table of limits.
//!
//! It says what can be said key by key; rules that join several fields are the check's.

use super::limits as limit;
use super::{Scenario, VERSION};
use crate::problem::Limit;
use serde_json::{Map, Value, json};

/// The schema as text.
pub fn schema() -> String {
    let mut text = serde_json::to_string_pretty(&made()).unwrap_or_default();
    text.push('\n');
    text
}

/// The keys of numbers, or of lists of them, with their limits.
static NUMBERS: &[(&str, &Limit)] = &[
    ("look_ahead_s", &limit::LOOK_AHEAD),
    ("inner_radius_m", &limit::INNER_RADIUS),
    ("thickness_m", &limit::THICKNESS),
    ("density_kg_per_m3", &limit::DENSITY),
    ("heat_capacity_j_per_kg_k", &limit::HEAT_CAPACITY),
    ("conductivity_w_per_m_k", &limit::CONDUCTIVITY),
    ("inside_film_w_per_m2_k", &limit::FILM),
    ("contact_m2_k_per_w", &limit::CONTACT),
    ("at_c", &limit::TEMPERATURE),
    ("polynomial_in_c", &limit::COEFFICIENT),
    ("from_c", &limit::TEMPERATURE),
    ("to_c", &limit::TEMPERATURE),
    ("uniform_c", &limit::TEMPERATURE),
    ("per_layer_c", &limit::TEMPERATURE),
    ("from_inside_m", &limit::DISTANCE),
    ("from_outside_m", &limit::DISTANCE),
    ("contents_c", &limit::TEMPERATURE),
    ("from_s", &limit::TIME),
    ("held_c", &limit::TEMPERATURE),
    ("heat_flux_into_w_per_m2", &limit::HEAT_FLUX),
    ("temperature_c", &limit::TEMPERATURE),
    ("film_w_per_m2_k", &limit::FILM),
    ("emissivity", &limit::EMISSIVITY),
    ("radiation_to_c", &limit::TEMPERATURE),
    ("over_s", &limit::DURATION),
    ("at_s", &limit::TIME),
    ("values_c", &limit::TEMPERATURE),
    ("repeats_every_s", &limit::PERIOD),
    ("mean_c", &limit::TEMPERATURE),
    ("amplitude_k", &limit::AMPLITUDE),
    ("period_s", &limit::PERIOD),
    ("highest_at_s", &limit::WHEN),
    ("from_w_per_m2", &limit::HEAT_FLUX),
    ("to_w_per_m2", &limit::HEAT_FLUX),
    ("values_w_per_m2", &limit::HEAT_FLUX),
    ("mean_w_per_m2", &limit::HEAT_FLUX),
    ("amplitude_w_per_m2", &limit::FLUX_AMPLITUDE),
    ("below_c", &limit::TEMPERATURE),
    ("above_c", &limit::TEMPERATURE),
    ("below_k", &limit::DIFFERENCE),
    ("below_k_per_h", &limit::RATE),
];

/// The keys of lists, with the lowest and highest number of entries.
static LISTS: &[(&str, usize, usize)] = &[
    ("layers", 1, limit::LAYERS),
    ("probes", 0, limit::PROBES),
    ("ready_when", 0, limit::CONDITIONS),
    ("must_not", 0, limit::CONDITIONS),
    ("inner", 0, limit::ROWS),
    ("outer", 0, limit::ROWS),
    ("per_layer_c", 1, limit::LAYERS),
    ("profile", 1, limit::PROPERTY_POINTS),
    ("at_c", 2, limit::PROPERTY_POINTS),
    ("values", 2, limit::PROPERTY_POINTS),
    ("polynomial_in_c", 1, limit::COEFFICIENTS),
    ("at_s", 2, limit::TABLE_POINTS),
    ("values_c", 2, limit::TABLE_POINTS),
    ("values_w_per_m2", 2, limit::TABLE_POINTS),
];

/// The keys of texts, with the highest number of letters.
static TEXTS: &[(&str, usize)] = &[
    ("title", limit::TITLE_LETTERS),
    ("notes", limit::NOTES_LETTERS),
    ("stopped_at", limit::NAME_LETTERS),
    ("name", limit::NAME_LETTERS),
    ("material", limit::NAME_LETTERS),
    ("of", limit::NAME_LETTERS),
];

/// Of these keys of a type exactly one is given.
static ONE_OF: &[(&str, &[&str])] = &[
    ("WrittenStart", super::read::START),
    ("WrittenFace", super::read_faces::KINDS),
    ("WrittenProbe", &["from_inside_m", "from_outside_m"]),
    ("WrittenCondition", super::read::CONDITION_LIMITS),
];

fn made() -> Value {
    let mut schema = schemars::schema_for!(Scenario).to_value();
    complete(&mut schema);
    schema["title"] = json!("Stillheat scenario");
    schema["properties"]["stillheat"]["const"] = json!(VERSION);
    for (name, keys) in ONE_OF {
        let each: Vec<Value> = keys.iter().map(|key| json!({ "required": [key] })).collect();
        schema["$defs"][name]["oneOf"] = Value::Array(each);
    }
    schema["$defs"]["WrittenFace"]["properties"]["insulated"]["const"] = json!(true);
    in_order(schema)
}

/// What a reader looks for first stands first.
fn in_order(schema: Value) -> Value {
    let mut ordered = Map::new();
    for key in ["$schema", "title", "description"] {
        ordered.insert(key.to_owned(), schema[key].clone());
    }
    if let Value::Object(keywords) = schema {
        ordered.extend(keywords);
    }
    Value::Object(ordered)
}

/// Forbids other keys in every object and null everywhere, and writes the limits in.
fn complete(schema: &mut Value) {
    match schema {
        Value::Array(list) => list.iter_mut().for_each(complete),
        Value::Object(keywords) => {
            forbid_null(keywords);
            keywords.values_mut().for_each(complete);
            let Some(Value::Object(properties)) = keywords.get_mut("properties") else { return };
            for (key, property) in properties {
                limit_property(key, property);
            }
            keywords.insert("additionalProperties".to_owned(), Value::Bool(false));
        }
        Value::Null | Value::Bool(_) | Value::Number(_) | Value::String(_) => {}
    }
}

/// A key that may be left out is left out, not null.
fn forbid_null(keywords: &mut Map<String, Value>) {
    if let Some(Value::Array(types)) = keywords.get_mut("type") {
        types.retain(|name| name != "null");
        if let [only] = types.as_slice() {
            let only = only.clone();
            keywords.insert("type".to_owned(), only);
        }
    }
    if let Some(Value::Array(choices)) = keywords.get_mut("anyOf") {
        choices.retain(|choice| choice["type"] != "null");
        if let [Value::Object(only)] = choices.as_slice() {
            let only = only.clone();
            keywords.remove("anyOf");
            keywords.extend(only);
        }
    }
}

fn limit_property(key: &str, property: &mut Value) {
    if let Some((_, limit)) = NUMBERS.iter().find(|(number, _)| *number == key) {
        let numbers = if property["type"] == "array" { &mut property["items"] } else { &mut *property };
        bound(numbers, limit);
    }
    if let Some((_, least, most)) = LISTS.iter().find(|(list, ..)| *list == key)
        && property["type"] == "array"
    {
        property["minItems"] = json!(least);
        property["maxItems"] = json!(most);
    }
    if let Some((_, most)) = TEXTS.iter().find(|(text, _)| *text == key) {
        property["maxLength"] = json!(most);
    }
}

/// Bounds a number and, where it may be an object, what stands in that for the number.
fn bound(number: &mut Value, limit: &Limit) {
    let mut bounds = Map::new();
    let lowest = if limit.lowest_allowed { "minimum" } else { "exclusiveMinimum" };
    bounds.insert(lowest.to_owned(), json!(limit.lowest));
    bounds.insert("maximum".to_owned(), json!(limit.highest));
    let Value::Object(keywords) = number else { return };
    if let Some(of) = keywords.get("$ref") {
        let property = of == "#/$defs/WrittenProperty";
        let mut inside = Map::new();
        for key in super::at::SPREAD {
            inside.insert((*key).to_owned(), Value::Object(bounds.clone()));
        }
        if property {
            inside.insert("values".to_owned(), json!({ "items": bounds }));
        }
        keywords.insert("properties".to_owned(), Value::Object(inside));
    }
    keywords.extend(bounds);
}

#[cfg(test)]
#[path = "schema/tests.rs"]
mod tests;
