//! What is opened and saved says the same.

use serde_json::Value;
use stillheat::scenario;

/// All examples, and the scenarios of the reference cases.
fn scenarios() -> Vec<(String, Value)> {
    let mut all: Vec<(String, Value)> = scenario::examples()
        .iter()
        .map(|example| (example.id.to_owned(), serde_json::from_str(example.text).expect("it is JSON")))
        .collect();
    let folder = concat!(env!("CARGO_MANIFEST_DIR"), "/tests/reference");
    for entry in std::fs::read_dir(folder).expect("the folder is there") {
        let path = entry.expect("an entry").path();
        let text = std::fs::read_to_string(&path).expect("a readable file");
        let mut case: Value = serde_json::from_str(&text).expect("it is JSON");
        all.push((path.display().to_string(), case["scenario"].take()));
    }
    all
}

/// The same with every number as a fraction: 20 and 20.0 mean the same.
fn plain(value: &Value) -> Value {
    match value {
        Value::Number(number) => number.as_f64().map_or(Value::Null, Value::from),
        Value::Array(list) => list.iter().map(plain).collect(),
        Value::Object(object) => object.iter().map(|(key, value)| (key.clone(), plain(value))).collect(),
        Value::Null | Value::Bool(_) | Value::String(_) => value.clone(),
    }
}

#[test]
fn what_is_opened_and_saved_means_the_same() {
    let all = scenarios();
    assert!(all.len() > 40, "only {} scenarios", all.len());
    for (name, value) in all {
        let opened =
            scenario::read(&value.to_string()).unwrap_or_else(|problems| panic!("{name}: {problems:?}"));
        let saved = serde_json::to_string(&opened).expect("a scenario can be written");
        assert_eq!(scenario::read(&saved).as_ref(), Ok(&opened), "{name}");
        let saved: Value = serde_json::from_str(&saved).expect("it is JSON");
        assert_eq!(plain(&saved), plain(&value), "{name}");
    }
}
