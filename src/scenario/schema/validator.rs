//! As much of JSON Schema 2020-12 as our schema uses; a keyword that is not known here fails the test.

use serde_json::Value;

/// Does a value satisfy a schema, whose `$ref`s point into `root`?
pub fn valid(root: &Value, schema: &Value, value: &Value) -> bool {
    let Value::Object(keywords) = schema else { panic!("{schema} is no schema") };
    keywords.iter().all(|(keyword, says)| holds(root, schema, (keyword, says), value))
}

fn holds(root: &Value, schema: &Value, (keyword, says): (&str, &Value), value: &Value) -> bool {
    let every = |schemas: &Value| -> Vec<bool> {
        let schemas = schemas.as_array().expect("a list of schemas");
        schemas.iter().map(|schema| valid(root, schema, value)).collect()
    };
    match keyword {
        "$schema" | "$defs" | "title" | "description" | "default" | "format" => true,
        "$ref" => {
            let pointer = says.as_str().and_then(|says| says.strip_prefix('#')).expect("a local pointer");
            valid(root, root.pointer(pointer).expect("the pointer leads somewhere"), value)
        }
        "type" => is_a(says.as_str().expect("one type"), value),
        "const" => value == says,
        "enum" => says.as_array().expect("a list of words").contains(value),
        "anyOf" => every(says).into_iter().any(|valid| valid),
        "oneOf" => every(says).into_iter().filter(|valid| *valid).count() == 1,
        "properties" => says
            .as_object()
            .expect("schemas by key")
            .iter()
            .all(|(key, schema)| value.get(key).is_none_or(|value| valid(root, schema, value))),
        "required" => says
            .as_array()
            .expect("a list of keys")
            .iter()
            .all(|key| !value.is_object() || value.get(key.as_str().expect("a key")).is_some()),
        "additionalProperties" => {
            assert_eq!(says, &Value::Bool(false));
            let known = &schema["properties"];
            value.as_object().is_none_or(|object| object.keys().all(|key| known.get(key).is_some()))
        }
        "items" => value.as_array().is_none_or(|list| list.iter().all(|value| valid(root, says, value))),
        "minItems" => value.as_array().is_none_or(|list| list.len() as u64 >= whole(says)),
        "maxItems" => value.as_array().is_none_or(|list| list.len() as u64 <= whole(says)),
        "maxLength" => value.as_str().is_none_or(|text| text.chars().count() as u64 <= whole(says)),
        "minimum" => value.as_f64().is_none_or(|x| x >= number(says)),
        "exclusiveMinimum" => value.as_f64().is_none_or(|x| x > number(says)),
        "maximum" => value.as_f64().is_none_or(|x| x <= number(says)),
        other => panic!("the keyword {other} is not known to the test"),
    }
}

fn is_a(name: &str, value: &Value) -> bool {
    match name {
        "object" => value.is_object(),
        "array" => value.is_array(),
        "string" => value.is_string(),
        "number" => value.is_number(),
        "integer" => value.is_u64() || value.is_i64(),
        "boolean" => value.is_boolean(),
        other => panic!("the type {other} is not known to the test"),
    }
}

fn whole(says: &Value) -> u64 {
    says.as_u64().expect("a whole number")
}

fn number(says: &Value) -> f64 {
    says.as_f64().expect("a number")
}
