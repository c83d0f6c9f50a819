//! Fields that cannot both hold, and rules across fields.

use super::kit::{Row, with};
use serde_json::{Value, json};

/// (changes, the places named, what is said)
type Case = (Vec<(&'static str, Value)>, Vec<&'static str>, &'static str);

fn rows(cases: Vec<Case>) -> Vec<Row> {
    let row = |(changes, places, says): Case| {
        let name = changes.iter().map(|(place, value)| format!("{place} = {value:.80}")).collect::<Vec<_>>();
        Row::new(name.join(", "), &with(&changes), &places, says)
    };
    cases.into_iter().map(row).collect()
}

/// What one face sees.
pub fn faces() -> Vec<Row> {
    let outer = "/surroundings/outer/0";
    let at = |face: Value, says| (vec![(outer, face)], vec![outer], says);
    let row = "/surroundings/outer/1/from_s";
    rows(vec![
        at(json!({}), "nothing says what the face sees"),
        at(json!({ "from_s": 0 }), "nothing says what the face sees"),
        at(json!({ "held_c": 20, "insulated": true }), "insulated and held_c are both given"),
        at(json!({ "held_c": 20, "heat_flux_into_w_per_m2": 1 }), "both given; only one can hold"),
        at(json!({ "temperature_c": 20, "heat_flux_into_w_per_m2": 1, "film_w_per_m2_k": 5 }), "both given"),
        at(json!({ "held_c": 20, "film_w_per_m2_k": 5 }), "held_c and film_w_per_m2_k are both given"),
        at(json!({ "insulated": true, "emissivity": 0.5 }), "insulated and emissivity are both given"),
        at(json!({ "film_w_per_m2_k": 5 }), "without temperature_c"),
        at(json!({ "radiation_to_c": 5 }), "without temperature_c"),
        at(json!({ "temperature_c": 20 }), "needs film_w_per_m2_k or emissivity"),
        at(json!({ "temperature_c": 20, "film_w_per_m2_k": 5, "radiation_to_c": 5 }), "without emissivity"),
        (
            vec![("/surroundings/outer/0/from_s", json!(60))],
            vec!["/surroundings/outer/0/from_s"],
            "begin at 0",
        ),
        (vec![(row, json!(0))], vec![row], "0 s does not come after 0 s"),
        (
            vec![("/surroundings/inner/1/from_s", json!(0))],
            vec!["/surroundings/inner/1/from_s"],
            "come after",
        ),
        (vec![(row, json!(1e-9))], vec![row], "come after"),
        (
            vec![(
                "/surroundings/outer",
                json!([{ "held_c": 1 }, { "held_c": 1, "from_s": 9 }, { "held_c": 1, "from_s": 8 }]),
            )],
            vec!["/surroundings/outer/2/from_s"],
            "8 s does not come after 9 s",
        ),
    ])
}

/// A quantity over time.
pub fn over_time() -> Vec<Row> {
    let held = "/surroundings/outer/0";
    let at = |value: Value, place, says| (vec![(held, json!({ "held_c": value }))], vec![place], says);
    let flux = |value: Value, place, says| {
        (vec![(held, json!({ "heat_flux_into_w_per_m2": value }))], vec![place], says)
    };
    rows(vec![
        at(json!({}), "/surroundings/outer/0/held_c", "a ramp"),
        at(
            json!({ "from_c": 1, "to_c": 2 }),
            "/surroundings/outer/0/held_c/over_s",
            "how long the ramp takes",
        ),
        at(
            json!({ "from_c": 1, "to_c": 2, "over_s": 0 }),
            "/surroundings/outer/0/held_c/over_s",
            "not allowed",
        ),
        at(
            json!({ "from_c": 1, "to_c": 9e9, "over_s": 1 }),
            "/surroundings/outer/0/held_c/to_c",
            "not allowed",
        ),
        at(json!({ "at_s": [0, 1, 2], "values_c": [1, 2] }), "/surroundings/outer/0/held_c", "go in pairs"),
        at(
            json!({ "at_s": [0, 5, 5], "values_c": [1, 2, 3] }),
            "/surroundings/outer/0/held_c/at_s/2",
            "ascend",
        ),
        at(
            json!({ "at_s": [0, 5, 4], "values_c": [1, 2, 3] }),
            "/surroundings/outer/0/held_c/at_s/2",
            "ascend",
        ),
        at(
            json!({ "at_s": [0, 1e-300], "values_c": [1, 2] }),
            "/surroundings/outer/0/held_c/at_s/1",
            "ascend",
        ),
        at(
            json!({ "at_s": [-1, 5], "values_c": [1, 2] }),
            "/surroundings/outer/0/held_c/at_s/0",
            "not allowed",
        ),
        at(
            json!({ "at_s": [0, "5"], "values_c": [1, 2] }),
            "/surroundings/outer/0/held_c/at_s/1",
            "a number",
        ),
        at(
            json!({ "at_s": [0, 5], "values_c": [1, 1e7] }),
            "/surroundings/outer/0/held_c/values_c/1",
            "allowed",
        ),
        at(
            json!({ "at_s": [0, 90], "values_c": [1, 2], "repeats_every_s": 60 }),
            "/surroundings/outer/0/held_c/repeats_every_s",
            "a period of 60 s is shorter than its table of 90 s",
        ),
        at(
            json!({ "mean_c": 0, "amplitude_k": 300, "period_s": 60, "highest_at_s": 0 }),
            "/surroundings/outer/0/held_c/amplitude_k",
            "falls to -300 °C",
        ),
        at(
            json!({ "mean_c": 3000, "amplitude_k": 600, "period_s": 60, "highest_at_s": 0 }),
            "/surroundings/outer/0/held_c/amplitude_k",
            "rises to 3600 °C",
        ),
        at(
            json!({ "mean_c": 9, "amplitude_k": 6, "period_s": 0, "highest_at_s": 0 }),
            "/surroundings/outer/0/held_c/period_s",
            "a period is at least 1 s",
        ),
        at(
            json!({ "value": 20, "low": 21, "high": 22 }),
            "/surroundings/outer/0/held_c",
            "between low and high",
        ),
        at(
            json!({ "value": 20, "low": 25, "high": 15 }),
            "/surroundings/outer/0/held_c",
            "between low and high",
        ),
        flux(json!(2e7), "/surroundings/outer/0/heat_flux_into_w_per_m2", "a heat flux is at least"),
        flux(
            json!({ "from_w_per_m2": 0, "to_w_per_m2": 5, "over_s": 1e10 }),
            "/surroundings/outer/0/heat_flux_into_w_per_m2/over_s",
            "a length of time",
        ),
        flux(
            json!({ "at_s": [0, 1], "values_w_per_m2": [1] }),
            "/surroundings/outer/0/heat_flux_into_w_per_m2/values_w_per_m2",
            "1 values; at least 2",
        ),
        flux(
            json!({ "mean_w_per_m2": 0, "amplitude_w_per_m2": -5, "period_s": 60, "highest_at_s": 0 }),
            "/surroundings/outer/0/heat_flux_into_w_per_m2/amplitude_w_per_m2",
            "an amplitude is at least 0",
        ),
    ])
}

/// Starts.
pub fn starts() -> Vec<Row> {
    let at = |start: Value, place, says| (vec![("/start", start)], vec![place], says);
    let point = |from: f64| json!({ "from_inside_m": from, "temperature_c": 20 });
    let outer = json!({ "held_c": 20 });
    let solid = ("/item/shape", json!("sphere"));
    rows(vec![
        at(json!({}), "/start", "nothing says how it starts; one of uniform_c"),
        at(
            json!({ "uniform_c": 20, "per_layer_c": [1, 2, 3] }),
            "/start",
            "uniform_c and per_layer_c are both",
        ),
        (vec![("/start/uniform_c", json!(20))], vec!["/start"], "uniform_c and steady_before are both given"),
        at(json!({ "per_layer_c": [20, 30] }), "/start/per_layer_c", "2 temperatures for 3 layers"),
        at(json!({ "per_layer_c": [20, 30, 40, 50] }), "/start/per_layer_c", "4 temperatures for 3 layers"),
        at(json!({ "per_layer_c": [20, null, 40] }), "/start/per_layer_c/1", "null found"),
        at(
            json!({ "profile": [point(0.0), point(0.4)] }),
            "/start/profile/1/from_inside_m",
            "outside the item",
        ),
        at(json!({ "profile": [point(0.1), point(0.1)] }), "/start/profile/1/from_inside_m", "come after"),
        at(json!({ "profile": [point(0.1), point(0.05)] }), "/start/profile/1/from_inside_m", "come after"),
        at(json!({ "profile": [point(0.0), point(1e-300)] }), "/start/profile/1/from_inside_m", "come after"),
        at(json!({ "profile": [point(-0.1)] }), "/start/profile/0/from_inside_m", "not allowed"),
        (
            vec![("/start/steady_before/contents_c", json!(900))],
            vec!["/start/steady_before"],
            "contents_c and inner are both given",
        ),
        (
            vec![solid.clone(), ("/surroundings/inner", json!([])), ("/ready_when", json!([]))],
            vec!["/start/steady_before/inner"],
            "a solid has no inner face",
        ),
        at(
            json!({ "steady_before": { "outer": { "insulated": true } } }),
            "/start/steady_before",
            "no steady state exists",
        ),
        at(
            json!({ "steady_before": { "outer": { "heat_flux_into_w_per_m2": 100 } } }),
            "/start/steady_before",
            "no steady state exists",
        ),
        at(json!({ "steady_before": { "outer": {} } }), "/start/steady_before/outer", "nothing says what"),
        at(
            json!({ "steady_before": { "contents_c": 50, "outer": { "from_s": 60, "held_c": 20 } } }),
            "/start/steady_before/outer/from_s",
            "has no beginning",
        ),
        at(
            json!({ "steady_before": { "contents_c": 5e3, "outer": outer } }),
            "/start/steady_before/contents_c",
            "",
        ),
        at(
            json!({ "uniform_c": { "value": 20, "low": 10, "high": 1e9 } }),
            "/start/uniform_c/high",
            "not allowed",
        ),
    ])
}

/// Layers, their shape and their properties.
pub fn layers() -> Vec<Row> {
    const CONDUCTIVITY: &str = "/item/layers/0/conductivity_w_per_m_k";
    let property = |value: Value, place, says| (vec![(CONDUCTIVITY, value)], vec![place], says);
    let polynomial =
        |coefficients: Value| json!({ "polynomial_in_c": coefficients, "from_c": 0, "to_c": 1000 });
    // Touches 0 from above except in a notch of 2 K about 503 °C: 1e-4 ((T - 503)² - 1).
    let notch = json!([25.300_8, -0.1006, 1e-4]);
    rows(vec![
        (
            vec![("/item/inner_radius_m", json!(0.5))],
            vec!["/item/inner_radius_m"],
            "a slab has no inner radius",
        ),
        (
            vec![
                ("/item/shape", json!("cylinder")),
                ("/start", json!({ "uniform_c": 20 })),
                ("/ready_when", json!([])),
            ],
            vec!["/surroundings/inner"],
            "a solid has no inner face",
        ),
        (
            vec![("/item/layers/0/contact_m2_k_per_w", json!(0.01))],
            vec!["/item/layers/0/contact_m2_k_per_w"],
            "nothing inside it",
        ),
        (
            vec![("/item/layers/0/inside_film_w_per_m2_k", json!(100))],
            vec!["/item/layers/0/inside_film_w_per_m2_k"],
            "a still layer has no inside film",
        ),
        (
            vec![("/item/layers/0/motion", json!("stirred"))],
            vec!["/item/layers/0/inside_film_w_per_m2_k"],
            "the film between the moving contents",
        ),
        (vec![("/item/layers/0/name", json!("item"))], vec!["/item/layers/0/name"], "all layers together"),
        (vec![("/item/layers/0/name", json!("brick\u{1b}[2J"))], vec!["/item/layers/0/name"], "control"),
        (vec![("/title", json!("a\u{0}b"))], vec!["/title"], "control"),
        (
            vec![("/item/layers/0/thickness_m", json!(1e-300))],
            vec!["/item/layers/0/thickness_m"],
            "not allowed",
        ),
        property(
            json!({ "at_c": [0, 100], "values": [1] }),
            "/item/layers/0/conductivity_w_per_m_k/values",
            "least 2",
        ),
        property(json!({ "at_c": [0, 100], "values": [1, 2, 3] }), CONDUCTIVITY, "go in pairs"),
        property(
            json!({ "at_c": [100, 0], "values": [1, 2] }),
            "/item/layers/0/conductivity_w_per_m_k/at_c/1",
            "ascend",
        ),
        property(
            json!({ "at_c": [20, 20.000_000_000_000_004], "values": [1, 2] }),
            "/item/layers/0/conductivity_w_per_m_k/at_c/1",
            "ascend",
        ),
        property(
            json!({ "at_c": [0, 9], "values": [1, 0] }),
            "/item/layers/0/conductivity_w_per_m_k/values/1",
            "allowed",
        ),
        property(
            json!({ "polynomial_in_c": [1], "from_c": 9, "to_c": 9 }),
            CONDUCTIVITY,
            "from_c 9 is not below to_c 9",
        ),
        property(
            json!({ "polynomial_in_c": [1], "from_c": 20, "to_c": 20.000_000_000_000_004 }),
            CONDUCTIVITY,
            "is not below to_c",
        ),
        property(
            polynomial(json!([])),
            "/item/layers/0/conductivity_w_per_m_k/polynomial_in_c",
            "0 coefficients",
        ),
        property(
            polynomial(json!([1, 1e13])),
            "/item/layers/0/conductivity_w_per_m_k/polynomial_in_c/1",
            "allowed",
        ),
        property(polynomial(json!([1, -0.01])), CONDUCTIVITY, "it falls to -9 W/(m K) within its range"),
        property(polynomial(notch), CONDUCTIVITY, "it falls to -0.0001 W/(m K) within its range"),
        property(polynomial(json!([1, 10])), CONDUCTIVITY, "it rises to 10001 W/(m K) within its range"),
        property(polynomial(json!([0, 0, 0, 0, 0, 1e12])), CONDUCTIVITY, "it"),
    ])
}

/// Probes and conditions.
pub fn conditions() -> Vec<Row> {
    let probe = |value: Value, place, says| (vec![("/probes/0", value)], vec![place], says);
    let watch = |value: Value, place, says| (vec![("/ready_when/0", value)], vec![place], says);
    let twin = |name: &str| json!({ "name": name, "from_inside_m": 0.1 });
    let here = "/ready_when/0";
    rows(vec![
        probe(
            json!({ "name": "thermocouple", "from_inside_m": 0.4 }),
            "/probes/0/from_inside_m",
            "outside the item",
        ),
        probe(
            json!({ "name": "thermocouple", "from_outside_m": 0.4 }),
            "/probes/0/from_outside_m",
            "outside the item",
        ),
        probe(
            json!({ "name": "thermocouple", "from_inside_m": 0, "from_outside_m": 0 }),
            "/probes/0",
            "exactly one",
        ),
        probe(json!({ "name": "thermocouple" }), "/probes/0", "exactly one"),
        (vec![("/probes/0/name", json!(" "))], vec!["/probes/0/name"], "a name that conditions can refer to"),
        (
            vec![("/probes", json!([twin("thermocouple"), twin("thermocouple")]))],
            vec!["/probes/1/name"],
            "two probes",
        ),
        watch(json!({ "what": "mean" }), here, "no limit is given; one of below_c, above_c, below_k"),
        watch(
            json!({ "what": "mean", "below_c": 50, "above_c": 20 }),
            here,
            "below_c and above_c are both given",
        ),
        watch(json!({ "what": "mean", "below_k": 5 }), here, "given by below_c or above_c"),
        watch(
            json!({ "what": "rate", "below_c": 50 }),
            here,
            "the limit of a rate is given by below_k_per_h",
        ),
        watch(json!({ "what": "rate", "below_k_per_h": 0 }), "/ready_when/0/below_k_per_h", "not allowed"),
        watch(json!({ "what": "difference", "above_c": 50 }), here, "given by below_k"),
        watch(json!({ "what": "difference", "below_k": -5 }), "/ready_when/0/below_k", "not allowed"),
        watch(json!({ "what": "face", "below_c": 50 }), "/ready_when/0/of", "which face"),
        watch(json!({ "what": "probe", "below_c": 50 }), "/ready_when/0/of", "which probe: thermocouple"),
        watch(
            json!({ "what": "mean", "of": "shel", "below_c": 50 }),
            "/ready_when/0/of",
            "Did you mean \"shell\"?",
        ),
        watch(json!({ "what": "mean", "of": "thermocouple", "below_c": 5 }), "/ready_when/0/of", "not known"),
        watch(
            json!({ "what": "mean", "below_c": { "value": 5, "low": 6, "high": 7 } }),
            "/ready_when/0/below_c",
            "between low and high",
        ),
        (
            vec![
                ("/item/layers/1/name", json!("brick")),
                ("/item/layers/0/name", json!("brick")),
                ("/must_not", json!([{ "what": "mean", "of": "brick", "below_c": 5 }])),
            ],
            vec!["/must_not/0/of"],
            "two layers are called \"brick\"",
        ),
        (
            vec![
                ("/item/shape", json!("sphere")),
                ("/start", json!({ "uniform_c": 20 })),
                ("/surroundings/inner", json!([])),
            ],
            vec!["/ready_when/0/of"],
            "a solid has no inner face",
        ),
    ])
}
