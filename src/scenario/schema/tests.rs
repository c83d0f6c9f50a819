use super::super::{at, examples, read, read_faces, read_layers};
use super::{ONE_OF, made};
use crate::problem::Trouble;
use serde_json::{Value, json};
use std::collections::BTreeSet;

#[path = "validator.rs"]
mod validator;

/// Scenarios in which every key of the file stands at least once.
fn with_every_key() -> Vec<Value> {
    let property = json!({ "at_c": [0, 100], "values": [20, 30] });
    let polynomial = json!({ "polynomial_in_c": [400, 0.1], "from_c": 0, "to_c": 500 });
    let spread = json!({ "value": 20, "low": 15, "high": 30 });
    let ramp = json!({ "from_c": 20, "to_c": 30, "over_s": 600 });
    let table = json!({ "at_s": [0, 60], "values_c": [20, 30], "repeats_every_s": 86_400 });
    let cycle = json!({ "mean_c": 9, "amplitude_k": 6, "period_s": 86_400, "highest_at_s": -7_200 });
    let flux_ramp = json!({ "from_w_per_m2": 20, "to_w_per_m2": 30, "over_s": 600 });
    let flux_table = json!({ "at_s": [0, 60], "values_w_per_m2": [20, 30], "repeats_every_s": 90 });
    let flux_cycle =
        json!({ "mean_w_per_m2": 9, "amplitude_w_per_m2": 6, "period_s": 60, "highest_at_s": 30 });
    let first = json!({
        "stillheat": 1, "title": "every key", "notes": "none", "stopped_at": "2026-03-01T06:00",
        "look_ahead_s": 100,
        "item": { "shape": "cylinder", "inner_radius_m": 0.1, "layers": [
            { "name": "a", "material": "water", "thickness_m": spread.clone(), "motion": "stirred",
              "inside_film_w_per_m2_k": 200 },
            { "name": "b", "thickness_m": 0.1, "density_kg_per_m3": 1000,
              "heat_capacity_j_per_kg_k": polynomial, "conductivity_w_per_m_k": property,
              "contact_m2_k_per_w": 0.01 },
            { "thickness_m": 0.1, "density_kg_per_m3": spread.clone(), "heat_capacity_j_per_kg_k": 500,
              "conductivity_w_per_m_k": 1 },
        ] },
        "start": { "steady_before": { "contents_c": 90, "outer": { "held_c": spread.clone() } } },
        "surroundings": {
            "inner": [
                { "from_s": 0, "insulated": true },
                { "from_s": 10, "held_c": ramp },
                { "from_s": 20, "heat_flux_into_w_per_m2": flux_ramp },
                { "from_s": 30, "heat_flux_into_w_per_m2": flux_table },
                { "from_s": 40, "heat_flux_into_w_per_m2": flux_cycle },
            ],
            "outer": [
                { "temperature_c": table, "film_w_per_m2_k": spread.clone(), "emissivity": 0.5,
                  "radiation_to_c": cycle },
            ],
        },
        "probes": [{ "name": "p", "from_inside_m": 0.1 }, { "name": "q", "from_outside_m": 0.1 }],
        "ready_when": [
            { "what": "probe", "of": "p", "below_c": 50 }, { "what": "mean", "above_c": spread.clone() },
            { "what": "difference", "below_k": 5 }, { "what": "rate", "below_k_per_h": 5 },
        ],
        "must_not": [{ "what": "hottest", "above_c": 95 }],
    });
    let start = |start: Value| {
        let mut scenario = first.clone();
        scenario["start"] = start;
        scenario
    };
    let point = json!({ "from_inside_m": 0.1, "temperature_c": 20 });
    let face = json!({ "temperature_c": 20, "film_w_per_m2_k": 5 });
    vec![
        start(json!({ "uniform_c": 20 })),
        start(json!({ "per_layer_c": [20, spread, 30] })),
        start(json!({ "profile": [point] })),
        start(json!({ "steady_before": { "inner": face, "outer": { "held_c": 20 } } })),
        first,
    ]
}

/// Places of all numbers in a value.
fn numbers(value: &Value, place: &str, found: &mut Vec<String>) {
    match value {
        Value::Number(_) => found.push(place.to_owned()),
        Value::Array(list) => {
            for (i, value) in list.iter().enumerate() {
                numbers(value, &format!("{place}/{i}"), found);
            }
        }
        Value::Object(object) => {
            for (key, value) in object {
                numbers(value, &format!("{place}/{key}"), found);
            }
        }
        Value::Null | Value::Bool(_) | Value::String(_) => {}
    }
}

/// The keys of every object whose keys are all known.
fn objects(schema: &Value, found: &mut BTreeSet<BTreeSet<String>>) {
    let inside: Vec<&Value> = match schema {
        Value::Array(list) => list.iter().collect(),
        Value::Object(keywords) => keywords.values().collect(),
        Value::Null | Value::Bool(_) | Value::Number(_) | Value::String(_) => return,
    };
    if schema["additionalProperties"] == false {
        let properties = schema["properties"].as_object().expect("schemas by key");
        found.insert(properties.keys().cloned().collect());
    } else {
        assert_ne!(schema["type"], "object", "other keys are forbidden in {schema}");
    }
    for value in inside {
        objects(value, found);
    }
}

#[test]
fn the_schema_knows_exactly_the_keys_of_the_reader() {
    let read = [
        read::SCENARIO,
        read::ITEM,
        read_layers::LAYER,
        read_layers::PROPERTY_TABLE,
        read_layers::PROPERTY_POLYNOMIAL,
        read::START,
        read::PROFILE_POINT,
        read::STEADY_BEFORE,
        read::PROBE,
        read::CONDITION,
        read_faces::SURROUNDINGS,
        read_faces::FACE,
        read_faces::CELSIUS.ramp,
        read_faces::CELSIUS.table,
        read_faces::CELSIUS.cycle,
        read_faces::FLUX.ramp,
        read_faces::FLUX.table,
        read_faces::FLUX.cycle,
        at::SPREAD,
    ];
    let read: BTreeSet<BTreeSet<String>> =
        read.iter().map(|keys| keys.iter().map(|key| (*key).to_owned()).collect()).collect();
    let mut said = BTreeSet::new();
    objects(&made(), &mut said);
    assert_eq!(said, read);
}

#[test]
fn all_examples_satisfy_the_schema() {
    let schema = made();
    assert_eq!(schema["$schema"], "https://json-schema.org/draft/2020-12/schema");
    for example in examples() {
        let value = serde_json::from_str(example.text).expect("an example is JSON");
        assert!(validator::valid(&schema, &schema, &value), "{}", example.id);
    }
}

#[test]
fn reader_and_schema_have_the_same_limits_at_every_number() {
    const TRIED: [f64; 11] = [-1e300, -300.0, -1.0, 0.0, 1e-9, 0.5, 7.0, 60.0, 9e3, 1e8, 1e300];
    let schema = made();
    for scenario in with_every_key() {
        assert!(read::read(&scenario.to_string()).is_ok(), "{:?}", read::read(&scenario.to_string()));
        assert!(validator::valid(&schema, &schema, &scenario), "{scenario}");
        let mut places = Vec::new();
        numbers(&scenario, "", &mut places);
        for place in places.iter().filter(|place| *place != "/stillheat") {
            for x in TRIED {
                let mut changed = scenario.clone();
                *changed.pointer_mut(place).expect("the place is there") = json!(x);
                let problems = read::read(&changed.to_string()).err().unwrap_or_default();
                let refused = problems
                    .iter()
                    .any(|one| one.path == *place && matches!(one.trouble, Trouble::OutOfRange { .. }));
                assert_eq!(!validator::valid(&schema, &schema, &changed), refused, "{place} = {x:e}");
            }
        }
    }
}

#[test]
fn the_schema_refuses_what_the_reader_refuses_at_a_key() {
    let schema = made();
    let good = with_every_key().pop().expect("there is one");
    let wrong = [
        ("/stillheat", json!(2)),
        ("/title", json!(null)),
        ("/title", json!("t".repeat(201))),
        ("/colour", json!("red")),
        ("/item/shape", json!("cube")),
        ("/item/layers", json!([])),
        ("/item/layers/0/motion", json!("flowing")),
        ("/item/layers/0/thickness_m", json!({ "value": 0.1, "low": -0.1, "high": 0.2 })),
        ("/item/layers/0/thickness_m", json!({ "value": 0.1, "low": 0.1, "high": 0.2, "unit": "m" })),
        ("/item/layers/1/conductivity_w_per_m_k", json!({ "at_c": [0, 1], "values": [0, 1] })),
        ("/item/layers/1/conductivity_w_per_m_k", json!({ "at_c": [0], "values": [1] })),
        ("/start", json!({})),
        ("/start/uniform_c", json!(20)),
        ("/surroundings/inner/0/insulated", json!(false)),
        ("/surroundings/inner/0/held_c", json!(20)),
        ("/probes/0/from_outside_m", json!(0)),
        ("/ready_when/0/above_c", json!(0)),
    ];
    for (place, value) in wrong {
        let mut changed = good.clone();
        let (parent, key) = place.rsplit_once('/').expect("a pointer begins with a slash");
        changed.pointer_mut(parent).expect("the object is there")[key] = value;
        assert!(read::read(&changed.to_string()).is_err(), "{place} read");
        assert!(!validator::valid(&schema, &schema, &changed), "{place} satisfies the schema");
    }
}

#[test]
fn exactly_one_of_is_said_of_types_that_are_there() {
    let schema = made();
    for (name, keys) in ONE_OF {
        let properties = &schema["$defs"][name]["properties"];
        assert!(keys.iter().all(|key| properties.get(key).is_some()), "{name}");
    }
}
