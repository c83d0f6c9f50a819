//! Every value of the wrong type or outside its limits.

use super::kit::{Row, with};
use serde_json::{Value, json};

/// A number and two values outside its limits. The places stand in the furnace wall, or are added to it.
const NUMBERS: &[(&str, f64, f64)] = &[
    ("/look_ahead_s", 0.0, 1e9),
    ("/item/inner_radius_m", -0.1, 51.0),
    ("/item/layers/0/thickness_m", 0.0, 51.0),
    ("/item/layers/0/density_kg_per_m3", 0.0, 40_000.0),
    ("/item/layers/1/heat_capacity_j_per_kg_k", 9.0, 2e5),
    ("/item/layers/2/conductivity_w_per_m_k", 0.0, 6_000.0),
    ("/item/layers/1/inside_film_w_per_m2_k", 0.0, 2e6),
    ("/item/layers/1/contact_m2_k_per_w", -1e-9, 101.0),
    ("/start/steady_before/inner/temperature_c", -273.15, 3_501.0),
    ("/start/steady_before/outer/film_w_per_m2_k", -6.0, 1e7),
    ("/start/steady_before/outer/emissivity", -0.1, 1.01),
    ("/surroundings/inner/1/from_s", -1.0, 4e9),
    ("/surroundings/outer/0/temperature_c", -300.0, 1e5),
    ("/surroundings/outer/1/film_w_per_m2_k", 0.0, 1e300),
    ("/surroundings/outer/1/emissivity", -1e-300, 1.000_1),
    ("/probes/0/from_inside_m", -0.05, 1_001.0),
    ("/ready_when/0/below_c", -271.0, 4_000.0),
];

/// Not numbers, with what the message calls them.
fn no_numbers() -> [(Value, &'static str); 6] {
    [
        (Value::Null, "null found"),
        (json!(true), "true found"),
        (json!("0.4"), "the text \"0.4\" found"),
        (json!("n".repeat(5_000)), "found"),
        (json!([1, 2]), "a list of 2 found"),
        (json!([]), "a list of 0 found"),
    ]
}

pub fn numbers() -> Vec<Row> {
    let mut rows = Vec::new();
    for &(place, low, high) in NUMBERS {
        for (wrong, says) in no_numbers() {
            rows.push(Row::new(format!("{place} = {wrong:.30}"), &with(&[(place, wrong)]), &[place], says));
        }
        for wrong in [low, high, -1e300, 1.797e308] {
            let text = with(&[(place, json!(wrong))]);
            rows.push(Row::new(format!("{place} = {wrong:e}"), &text, &[place], "is not allowed"));
        }
    }
    rows
}

/// Places that hold something else than a number, with what the message expects there.
const OTHERS: &[(&str, &str)] = &[
    ("/stillheat", "a whole number"),
    ("/title", "text in quotes"),
    ("/notes", "text in quotes"),
    ("/stopped_at", "text in quotes"),
    ("/item", "an object with shape and layers is expected"),
    ("/item/shape", "a word in quotes"),
    ("/item/layers", "a list"),
    ("/item/layers/1", "an object that describes a layer"),
    ("/item/layers/1/name", "text in quotes"),
    ("/item/layers/1/material", "text in quotes"),
    ("/item/layers/1/motion", "a word in quotes"),
    ("/start", "an object that says how it starts"),
    ("/start/steady_before", "the earlier surroundings"),
    ("/start/steady_before/outer", "an object that says what the face sees"),
    ("/surroundings", "an object with inner and outer"),
    ("/surroundings/outer", "a list"),
    ("/surroundings/outer/1", "an object that says what the face sees"),
    ("/surroundings/inner/0/insulated", "true (leave it out otherwise)"),
    ("/probes", "a list"),
    ("/probes/0", "a probe"),
    ("/probes/0/name", "text in quotes"),
    ("/ready_when", "a list"),
    ("/ready_when/1", "a condition"),
    ("/ready_when/1/what", "a word in quotes"),
    ("/ready_when/1/of", "text in quotes"),
];

pub fn retyped() -> Vec<Row> {
    let wrong = [Value::Null, json!(false), json!(-1.5)];
    let all = OTHERS.iter().flat_map(|other| wrong.iter().map(move |wrong| (other, wrong)));
    all.map(|((place, says), wrong)| {
        Row::new(format!("{place} = {wrong}"), &with(&[(place, wrong.clone())]), &[place], says)
    })
    .collect()
}

/// Words that are none of the allowed ones, with the hint.
const WORDS: &[(&str, &str, &str)] = &[
    ("/item/shape", "slap", "Did you mean \"slab\"?"),
    ("/item/shape", "Cylinder", "Did you mean \"cylinder\"?"),
    ("/item/shape", "cube", "allowed: slab, cylinder, sphere"),
    ("/item/shape", "", "allowed: slab, cylinder, sphere"),
    ("/item/layers/0/motion", "self_mixing", "Did you mean \"self-mixing\"?"),
    ("/item/layers/0/motion", "flowing", "allowed: still, self-mixing, stirred"),
    ("/item/layers/0/material", "fireclay", "Did you mean \"fireclay-brick\"?"),
    ("/item/layers/2/material", "steel-carbo", "Did you mean \"steel-carbon\"?"),
    ("/item/layers/2/material", "unobtainium", "\"unobtainium\" is not known"),
    ("/item/layers/2/material", "", "\"\" is not known"),
    ("/ready_when/0/what", "fase", "Did you mean \"face\"?"),
    ("/ready_when/0/what", "warmest", "allowed: hottest, coldest, mean"),
    ("/ready_when/0/of", "iner", "Did you mean \"inner\"?"),
    ("/ready_when/0/of", "hot face brick", "allowed: inner, outer"),
    ("/ready_when/1/of", "thermocuple", "Did you mean \"thermocouple\"?"),
    ("/ready_when/1/of", "outer", "allowed: thermocouple"),
    ("/stopped_at", "yesterday", "written as 2026-03-01T06:00"),
    ("/stopped_at", "2026-02-30T06:00", "is no date and time"),
    ("/stopped_at", "2026-03-01T24:01", "is no date and time"),
    ("/stopped_at", "2026-03-01", "is no date and time"),
    ("/stopped_at", "2026-03-01T06:00+01:00", "is no date and time"),
    ("/stopped_at", "99999-03-01T06:00", "is no date and time"),
    ("/stopped_at", "", "is no date and time"),
];

pub fn words() -> Vec<Row> {
    let row = |&(place, word, says): &(&str, &str, &str)| {
        Row::new(format!("{place} = {word:?}"), &with(&[(place, json!(word))]), &[place], says)
    };
    WORDS.iter().map(row).collect()
}

/// Lists and texts that are too long or too short.
pub fn sizes() -> Vec<Row> {
    let layer = json!({ "material": "steel-carbon", "thickness_m": 0.01 });
    let condition = json!({ "what": "mean", "below_c": 50 });
    let probes: Vec<Value> =
        (0..21).map(|i| json!({ "name": format!("probe {i}"), "from_inside_m": 0.01 })).collect();
    let points: Vec<Value> =
        (0..201).map(|i| json!({ "from_inside_m": f64::from(i) * 1e-4, "temperature_c": 20 })).collect();
    let rising = |length: usize| json!((0..length).collect::<Vec<_>>());
    let table = json!({ "held_c": { "at_s": rising(501), "values_c": vec![20; 501] } });
    let short = json!({ "held_c": { "at_s": [0], "values_c": [20] } });
    let property = json!({ "at_c": rising(201), "values": vec![20; 201] });
    let polynomial = json!({ "polynomial_in_c": vec![1; 7], "from_c": 0, "to_c": 100 });
    let cases = [
        ("/item/layers", json!(vec![layer; 21]), "", "21 layers; at most 20"),
        ("/item/layers", json!([]), "", "0 layers; at least 1"),
        ("/surroundings/outer", json!(vec![json!({ "held_c": 20 }); 201]), "", "201 rows; at most 200"),
        ("/surroundings/outer/0", table, "/held_c/at_s", "501 times; at most 500"),
        ("/surroundings/outer/0", short, "/held_c/at_s", "1 times; at least 2"),
        ("/probes", json!(probes), "", "21 probes; at most 20"),
        ("/ready_when", json!(vec![condition.clone(); 21]), "", "21 conditions; at most 20"),
        ("/must_not", json!(vec![condition; 21]), "", "21 limits; at most 20"),
        ("/start", json!({ "profile": points }), "/profile", "201 points; at most 200"),
        ("/start", json!({ "profile": [] }), "/profile", "0 points; at least 1"),
        ("/start", json!({ "per_layer_c": [] }), "/per_layer_c", "0 temperatures; at least 1"),
        ("/start", json!({ "per_layer_c": vec![20; 21] }), "/per_layer_c", "21 temperatures; at most 20"),
        ("/item/layers/0/conductivity_w_per_m_k", property, "/at_c", "201 temperatures; at most 200"),
        ("/item/layers/0/density_kg_per_m3", polynomial, "/polynomial_in_c", "7 coefficients; at most 6"),
        ("/title", json!("t".repeat(201)), "", "201 letters; at most 200"),
        ("/notes", json!("ü".repeat(10_001)), "", "10001 letters; at most 10000"),
        ("/stopped_at", json!("2".repeat(100)), "", "100 letters; at most 80"),
        ("/item/layers/0/name", json!("n".repeat(81)), "", "81 letters; at most 80"),
        ("/item/layers/0/material", json!("m".repeat(81)), "", "81 letters; at most 80"),
        ("/probes/0/name", json!("p".repeat(81)), "", "81 letters; at most 80"),
        ("/ready_when/0/of", json!("o".repeat(81)), "", "81 letters; at most 80"),
    ];
    let mut rows = Vec::new();
    for (place, wrong, inside, says) in cases {
        let mut places = vec![format!("{place}{inside}")];
        // The other list of the pair has the same wrong length.
        if let Some(parent) = places[0].strip_suffix("/at_s") {
            places.push(format!("{parent}/values_c"));
        } else if let Some(parent) = places[0].strip_suffix("/at_c") {
            places.push(format!("{parent}/values"));
        }
        let places: Vec<&str> = places.iter().map(String::as_str).collect();
        rows.push(Row::new(format!("{place}: {says}"), &with(&[(place, wrong)]), &places, says));
    }
    rows
}
