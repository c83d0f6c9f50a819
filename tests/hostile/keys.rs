//! Keys that are missing, unknown or there twice.

use super::kit::{Row, good, take, with};
use serde_json::{Value, json};

/// Keys that cannot be left out, and the place that is named when it is another.
const NEEDED: &[(&str, Option<&str>)] = &[
    ("/stillheat", Some("")),
    ("/item", None),
    ("/item/shape", None),
    ("/item/layers", None),
    ("/item/layers/1/thickness_m", None),
    ("/start", None),
    ("/start/steady_before", Some("/start")),
    ("/start/steady_before/outer", None),
    ("/start/steady_before/inner/film_w_per_m2_k", Some("/start/steady_before/inner")),
    ("/start/steady_before/inner/temperature_c", Some("/start/steady_before/inner")),
    ("/surroundings", None),
    ("/surroundings/inner/0/insulated", Some("/surroundings/inner/0")),
    ("/surroundings/inner/1/from_s", None),
    ("/surroundings/outer/0/temperature_c", Some("/surroundings/outer/0")),
    ("/probes", Some("/ready_when/1/of")),
    ("/probes/0/name", None),
    ("/probes/0/from_inside_m", Some("/probes/0")),
    ("/ready_when/0/what", None),
    ("/ready_when/0/of", None),
    ("/ready_when/0/below_c", Some("/ready_when/0")),
    ("/ready_when/1/of", None),
];

pub fn removed() -> Vec<Row> {
    let mut rows = Vec::new();
    for &(place, named) in NEEDED {
        let mut scenario = good();
        take(&mut scenario, place);
        rows.push(Row::new(format!("{place} removed"), &scenario, &[named.unwrap_or(place)], ""));
    }
    let mut scenario = good();
    take(&mut scenario, "/item/layers/2/material");
    let properties = ["density_kg_per_m3", "heat_capacity_j_per_kg_k", "conductivity_w_per_m_k"];
    let places = properties.map(|key| format!("/item/layers/2/{key}"));
    let places = [places[0].as_str(), &places[1], &places[2]];
    rows.push(Row::new("no material and no properties", &scenario, &places, "a layer without a material"));
    rows
}

/// A slip in a key at each kind of object: (object, slip, key that is meant).
const SLIPS: &[(&str, &str, &str)] = &[
    ("", "must_nott", "must_not"),
    ("", "look_ahead", "look_ahead_s"),
    ("/item", "inner_radius", "inner_radius_m"),
    ("/item/layers/0", "contact", "contact_m2_k_per_w"),
    ("/item/layers/0", "conductivity_w_per_mk", "conductivity_w_per_m_k"),
    ("/item/layers/0", "density", "density_kg_per_m3"),
    ("/item/layers/0", "Motion", "motion"),
    ("/start", "uniform", "uniform_c"),
    ("/start/steady_before", "content_c", "contents_c"),
    ("/start/steady_before/inner", "emisivity", "emissivity"),
    ("/start/steady_before/outer", "radiation_c", "radiation_to_c"),
    ("/surroundings/outer/0", "from_h", "from_s"),
    ("/surroundings/inner/0", "heat_flux_w_per_m2", "heat_flux_into_w_per_m2"),
    ("/probes/0", "from_outside", "from_outside_m"),
    ("/ready_when/0", "above", "above_c"),
    ("/ready_when/1", "below_k_per_hour", "below_k_per_h"),
];

pub fn unknown() -> Vec<Row> {
    let mut rows = Vec::new();
    for &(object, slip, meant) in SLIPS {
        let place = format!("{object}/{slip}");
        let says = format!("this key is not known. Did you mean \"{meant}\"?");
        rows.push(Row::new(&place, &with(&[(&place, json!(1))]), &[&place], &says));
    }
    for (key, place) in [("a/b", "/a~1b"), ("~", "/~0"), ("", "/"), ("\u{1F600}", "/\u{1F600}")] {
        let mut scenario = good();
        scenario.as_object_mut().expect("an object").insert(key.to_owned(), Value::Null);
        let says = "this key is not known. Known here: stillheat, title";
        rows.push(Row::new(format!("key {key:?}"), &scenario, &[place], says));
    }
    rows.extend(inside_numbers());
    rows
}

/// Slips inside the objects that stand in the place of a number.
fn inside_numbers() -> Vec<Row> {
    let face = "/surroundings/outer/0/temperature_c";
    let property = "/item/layers/0/conductivity_w_per_m_k";
    let cases = [
        (face, json!({ "value": 20, "low": 10, "hihg": 30 }), vec!["high", "hihg"], "Did you mean \"high\"?"),
        (
            face,
            json!({ "form_c": 20, "to_c": 30, "over_s": 60 }),
            vec!["from_c", "form_c"],
            "mean \"from_c\"?",
        ),
        (
            face,
            json!({ "at_s": [0, 9], "values_c": [1, 2], "repeats_s": 10 }),
            vec!["repeats_s"],
            "Did you mean \"repeats_every_s\"?",
        ),
        (
            face,
            json!({ "mean_c": 9, "amplitude_c": 5, "period_s": 86_400, "highest_at_s": 0 }),
            vec!["amplitude_c", "amplitude_k"],
            "Did you mean \"amplitude_k\"?",
        ),
        (face, json!({ "mean_c": 9 }), vec!["amplitude_k", "period_s", "highest_at_s"], "a day has 86400 s"),
        (face, json!({ "value": 9 }), vec!["low", "high"], "missing; hardly lower than this"),
        (property, json!({ "at_c": [0, 9], "value": [1, 2] }), vec!["value", "values"], "mean \"values\"?"),
        (
            property,
            json!({ "polynomial": [1], "from_c": 0, "to_c": 9 }),
            vec!["polynomial", "polynomial_in_c"],
            "mean \"polynomial_in_c\"?",
        ),
        (
            property,
            json!({ "value": 1, "low": 1, "high": 1, "unit": 1 }),
            vec!["unit"],
            "Known here: value, low",
        ),
    ];
    let row = |(object, value, keys, says): (&str, Value, Vec<&str>, &str)| {
        let places: Vec<String> = keys.iter().map(|key| format!("{object}/{key}")).collect();
        let places: Vec<&str> = places.iter().map(String::as_str).collect();
        Row::new(format!("{object} = {value}"), &with(&[(object, value.clone())]), &places, says)
    };
    cases.into_iter().map(row).collect()
}

/// The same key twice: (what stands there, what it becomes, the key).
const TWICE: &[(&str, &str, &str)] = &[
    ("\"stillheat\":1", "\"stillheat\":1,\"stillheat\":1", "/stillheat"),
    ("\"shape\":\"slab\"", "\"shape\":\"slab\",\"shape\":\"sphere\"", "/item/shape"),
    ("\"thickness_m\":0.008", "\"thickness_m\":0.008,\"thickness_m\":0.08", "/item/layers/2/thickness_m"),
    ("\"insulated\":true", "\"insulated\":true,\"insulated\":true", "/surroundings/inner/0/insulated"),
    ("\"low\":5,", "\"low\":5,\"low\":4,", "/surroundings/inner/1/film_w_per_m2_k/low"),
    ("\"name\":\"thermocouple\"", "\"name\":\"thermocouple\",\"na\\u006de\":\"x\"", "/probes/0/name"),
];

pub fn twice() -> Vec<Row> {
    let row = |&(from, to, key): &(&str, &str, &str)| {
        let text = good().to_string();
        assert!(text.contains(from), "{from} is in the scenario");
        Row::text(to, text.replacen(from, to, 1), &[key], "stands here twice")
    };
    TWICE.iter().map(row).collect()
}
