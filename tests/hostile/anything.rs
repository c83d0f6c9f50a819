//! Whatever the text: an answer or problems, and no panic.

use super::kit::put;
use proptest::prelude::*;
use serde_json::{Value, json};
use stillheat::scenario::{examples, limits};

/// Keys and words of the file, so that nonsense gets past the first rooms.
const WORDS: &[&str] = &[
    "stillheat",
    "item",
    "shape",
    "slab",
    "sphere",
    "layers",
    "thickness_m",
    "material",
    "water",
    "start",
    "uniform_c",
    "profile",
    "surroundings",
    "inner",
    "outer",
    "held_c",
    "temperature_c",
    "emissivity",
    "value",
    "low",
    "high",
    "at_s",
    "values_c",
    "probes",
    "name",
    "ready_when",
    "what",
    "mean",
    "below_c",
];

fn word() -> impl Strategy<Value = String> {
    prop_oneof![4 => proptest::sample::select(WORDS).prop_map(str::to_owned), 1 => any::<String>()]
}

fn json_value() -> impl Strategy<Value = Value> {
    let leaf = prop_oneof![
        Just(Value::Null),
        any::<bool>().prop_map(Value::Bool),
        any::<i32>().prop_map(|x| json!(x)),
        any::<f64>().prop_map(|x| json!(x)),
        (0.0..100.0).prop_map(|x| json!(x)),
        word().prop_map(Value::String),
    ];
    leaf.prop_recursive(4, 40, 5, |inside| {
        prop_oneof![
            proptest::collection::vec(inside.clone(), 0..5).prop_map(Value::Array),
            proptest::collection::vec((word(), inside), 0..5)
                .prop_map(|entries| Value::Object(entries.into_iter().collect())),
        ]
    })
}

/// An example, asked for its first day only, so that an answer takes little time.
fn example() -> impl Strategy<Value = Value> {
    proptest::sample::select(examples()).prop_map(|example| {
        let mut scenario: Value = serde_json::from_str(example.text).expect("an example is JSON");
        put(&mut scenario, "/look_ahead_s", json!(1e5));
        scenario
    })
}

/// Every place in a value, from the outside in.
fn places(value: &Value, place: &str, found: &mut Vec<String>) {
    let inside: Vec<(String, &Value)> = match value {
        Value::Array(list) => list.iter().enumerate().map(|(i, value)| (i.to_string(), value)).collect(),
        Value::Object(object) => object.iter().map(|(key, value)| (key.clone(), value)).collect(),
        Value::Null | Value::Bool(_) | Value::Number(_) | Value::String(_) => Vec::new(),
    };
    for (part, value) in inside {
        let place = format!("{place}/{part}");
        places(value, &place, found);
        found.push(place);
    }
}

/// The ends of all limits, and what lies just beside them.
fn extreme() -> impl Strategy<Value = f64> {
    let ends = limits::ALL.iter().flat_map(|(_, limit)| [limit.lowest, limit.highest]);
    let ends: Vec<f64> = ends.chain([0.0, 1e-300, -1e-300, 1.0]).collect();
    proptest::sample::select(ends)
}

/// An answer whose numbers can be written, or problems with words.
fn ends_well(text: &str) -> Result<(), TestCaseError> {
    match stillheat::solve(text) {
        Ok(solved) => {
            let report = format!("{:?}", solved.report);
            prop_assert!(!report.contains("NaN") && !report.contains(": inf"), "{report}");
        }
        Err(problems) => {
            prop_assert!(!problems.is_empty());
            prop_assert!(problems.iter().all(|problem| problem.to_string().len() > 5));
        }
    }
    Ok(())
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 100, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn bytes(bytes in proptest::collection::vec(any::<u8>(), 0..200)) {
        ends_well(&String::from_utf8_lossy(&bytes))?;
    }

    #[test]
    fn values(value in json_value()) {
        ends_well(&value.to_string())?;
    }

    #[test]
    fn a_scenario_with_nonsense_in_it(
        mut scenario in example(),
        at in any::<proptest::sample::Index>(),
        nonsense in json_value(),
    ) {
        let mut all = Vec::new();
        places(&scenario, "", &mut all);
        put(&mut scenario, at.get::<String>(&all), nonsense);
        ends_well(&scenario.to_string())?;
    }

    #[test]
    fn a_scenario_with_bytes_lost(scenario in example(), from in any::<proptest::sample::Index>(), lost in 1..9usize) {
        let text = scenario.to_string();
        let mut bytes = text.into_bytes();
        let from = from.index(bytes.len());
        bytes.drain(from..bytes.len().min(from + lost));
        ends_well(&String::from_utf8_lossy(&bytes))?;
    }

    #[test]
    fn a_scenario_at_the_ends_of_the_limits(
        mut scenario in example(),
        changes in proptest::collection::vec((any::<proptest::sample::Index>(), extreme()), 1..3),
    ) {
        let mut all = Vec::new();
        places(&scenario, "", &mut all);
        all.retain(|place| scenario.pointer(place).is_some_and(Value::is_number) && place != "/look_ahead_s");
        for (at, x) in changes {
            put(&mut scenario, at.get::<String>(&all), json!(x));
        }
        ends_well(&scenario.to_string())?;
    }
}
