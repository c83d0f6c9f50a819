//! Damaged and hostile texts: each is refused with words, each problem names its place, nothing panics.

#![cfg(not(target_arch = "wasm32"))]

#[path = "hostile/anything.rs"]
mod anything;
#[path = "hostile/keys.rs"]
mod keys;
#[path = "hostile/kit.rs"]
mod kit;
#[path = "hostile/round_trip.rs"]
mod round_trip;
#[path = "hostile/rules.rs"]
mod rules;
#[path = "hostile/texts.rs"]
mod texts;
#[path = "hostile/values.rs"]
mod values;

use kit::{Row, good, with};
use serde_json::json;

/// The rows of all tables.
fn rows() -> Vec<Row> {
    let tables = [
        values::numbers(),
        values::retyped(),
        values::words(),
        values::sizes(),
        keys::removed(),
        keys::unknown(),
        keys::twice(),
        texts::no_json(),
        texts::no_scenario(),
        texts::versions(),
        rules::faces(),
        rules::over_time(),
        rules::starts(),
        rules::layers(),
        rules::conditions(),
    ];
    tables.into_iter().flatten().collect()
}

#[test]
fn more_than_200_hostile_texts_are_refused_with_words_and_places() {
    let rows = rows();
    let faults: Vec<String> = rows.iter().filter_map(Row::fault).collect();
    assert!(faults.is_empty(), "{} of {}:\n{}", faults.len(), rows.len(), faults.join("\n"));
    assert!(rows.len() >= 200, "only {} texts", rows.len());
}

#[test]
fn the_undamaged_text_is_accepted_with_and_without_byte_order_mark() {
    let text = good().to_string();
    assert!(stillheat::solve(&text).is_ok());
    assert!(stillheat::solve(&format!("\u{feff}{text}")).is_ok());
}

#[test]
fn six_mistakes_of_six_kinds_are_told_together() {
    let scenario = with(&[
        ("/item/layers/0/material", json!("fireclay")),
        ("/item/layers/1/thickness_m", json!(-0.115)),
        ("/item/layers/2/colour", json!("red")),
        ("/surroundings/outer/1/from_s", json!(0)),
        ("/probes/0", json!({ "name": "thermocouple", "from_inside_m": "5 cm" })),
        ("/ready_when/0", json!({ "what": "rate", "below_c": 50 })),
    ]);
    let places = [
        "/item/layers/0/material",
        "/item/layers/1/thickness_m",
        "/item/layers/2/colour",
        "/surroundings/outer/1/from_s",
        "/probes/0/from_inside_m",
        "/ready_when/0",
    ];
    assert_eq!(Row::new("six mistakes", &scenario, &places, "Did you mean").fault(), None);
}

#[test]
fn what_hangs_on_an_unreadable_value_is_not_complained_about() {
    let scenario = with(&[
        // Without it the wall would be thinner than the place of the probe.
        ("/item/layers/0/thickness_m", json!(null)),
        // Without it the three properties would be missing.
        ("/item/layers/1/materiel", json!("insul-brick-1260")),
        // Without it a still layer would have a film.
        ("/item/layers/2/motion", json!("stired")),
        ("/item/layers/2/inside_film_w_per_m2_k", json!(100)),
        ("/start/steady_before/inner/film_w_per_m2_k", json!(0)),
        ("/start/steady_before/outer/film_w_per_m2_k", json!(0)),
    ]);
    let places = [
        "/item/layers/0/thickness_m",
        "/item/layers/1/materiel",
        "/item/layers/2/motion",
        "/start/steady_before/inner/film_w_per_m2_k",
        "/start/steady_before/outer/film_w_per_m2_k",
    ];
    let mut scenario = scenario;
    kit::take(&mut scenario, "/item/layers/1/material");
    assert_eq!(Row::new("hanging on", &scenario, &places, "").fault(), None);
}

#[test]
fn a_layer_may_be_called_like_a_face() {
    let condition = |of: &str| json!({ "what": "hottest", "of": of, "below_c": 50 });
    let scenario = with(&[
        ("/item/layers/0/name", json!("inner")),
        ("/item/layers/2/name", json!("outer")),
        ("/must_not", json!([condition("inner"), condition("outer"), condition("item")])),
    ]);
    assert!(stillheat::solve(&scenario.to_string()).is_ok());
}

#[test]
fn very_many_problems_are_counted_and_the_first_hundred_told() {
    let mut scenario = good();
    for i in 0..5_000 {
        scenario[format!("key {i}")] = json!(i);
    }
    let problems = stillheat::solve(&scenario.to_string()).expect_err("no such key is known");
    assert_eq!(problems.len(), stillheat::problem::TOLD + 1);
    assert!(problems.last().is_some_and(|last| last.to_string().contains("4900 problems more")));
}
