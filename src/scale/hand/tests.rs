use super::*;
use crate::scenario;
use crate::units::kelvin;
use approx::assert_relative_eq;

/// The formulas for each condition of `ready_when`; `rest` is the scenario without version and item.
fn hand(item: &str, rest: &str) -> Vec<Vec<HandResult>> {
    let text = format!(r#"{{"stillheat": 1, "item": {item}, {rest}}}"#);
    let scenario = scenario::read(&text).expect("the scenario reads");
    let checked = Item::check(&scenario).expect("the scenario can be solved");
    checked.item.ready_when().iter().map(|condition| formulas(&checked.item, condition)).collect()
}

fn one_layer(shape: &str, thickness: f64, conductivity: f64, density: f64, heat_capacity: f64) -> String {
    format!(
        r#"{{"shape": "{shape}", "layers": [{{"name": "body", "thickness_m": {thickness},
        "conductivity_w_per_m_k": {conductivity}, "density_kg_per_m3": {density},
        "heat_capacity_j_per_kg_k": {heat_capacity}}}]}}"#
    )
}

/// Uniform start, one film outside, these conditions.
fn in_air(start: f64, film: f64, surroundings: f64, ready_when: &str) -> String {
    format!(
        r#""start": {{"uniform_c": {start}}},
        "surroundings": {{"outer": [{{"temperature_c": {surroundings}, "film_w_per_m2_k": {film}}}]}},
        "ready_when": [{ready_when}]"#
    )
}

/// Water that mixes itself in a lagged steel vessel, at the stop as it has been running.
const VESSEL: &str = r#"{"shape": "cylinder", "layers": [
    {"name": "contents", "thickness_m": 0.4, "density_kg_per_m3": 1000, "heat_capacity_j_per_kg_k": 4180,
     "conductivity_w_per_m_k": 0.6, "motion": "self-mixing", "inside_film_w_per_m2_k": 300},
    {"name": "wall", "thickness_m": 0.008, "density_kg_per_m3": 7900, "heat_capacity_j_per_kg_k": 500,
     "conductivity_w_per_m_k": 15},
    {"name": "lagging", "thickness_m": 0.08, "density_kg_per_m3": 100, "heat_capacity_j_per_kg_k": 840,
     "conductivity_w_per_m_k": 0.04}]}"#;

#[track_caller]
fn result<'a>(all: &'a [HandResult], name: &str) -> &'a HandResult {
    all.iter().find(|result| result.name == name).expect("this formula has something to say")
}

#[track_caller]
fn time(result: &HandResult) -> f64 {
    match result.gives {
        Gives::Time(time) => time,
        Gives::Temperature(_) | Gives::Never { .. } => panic!("no time: {result:?}"),
    }
}

const LUMPED: &str = "one temperature throughout";
const ONE_TERM: &str = "one term of the series";
const THICK: &str = "thick wall";
const STEADY: &str = "steady";

// Expected times of the cases A01 to B05, D02, G01, S06: independent solutions in 30 digits or two ways.

#[test]
fn a_plate_nearly_uniform_inside_by_two_formulas() {
    let conditions = r#"{"what": "hottest", "below_c": 60}, {"what": "mean", "below_c": 200},
        {"what": "face", "of": "outer", "below_c": 60}"#;
    let all = hand(&one_layer("slab", 0.05, 45.0, 7850.0, 480.0), &in_air(650.0, 18.0, 20.0, conditions));
    for (results, truth) in all.iter().zip([29_082.369_9, 13_199.690_6, 28_977.354_8]) {
        let one_term = &results[0];
        assert_eq!((one_term.name, one_term.holds), (ONE_TERM, true));
        // Digits printed.
        assert_relative_eq!(time(one_term), truth, max_relative = 1e-8);
        let lumped = result(results, LUMPED);
        assert!(lumped.holds && lumped.validity.starts_with("Biot number 0.020, below 0.1"), "{lumped:?}");
        // The Biot number on the thickness is 0.02.
        assert_relative_eq!(time(lumped), truth, max_relative = 0.02);
    }
}

#[test]
fn a_drum_of_bitumen_by_one_term_from_fourier_number_0_2_on() {
    let conditions = r#"{"what": "hottest", "below_c": 60}, {"what": "mean", "below_c": 60},
        {"what": "face", "of": "outer", "below_c": 30}"#;
    let drum = one_layer("cylinder", 0.28, 0.17, 1000.0, 2000.0);
    let all = hand(&drum, &in_air(160.0, 9.0, 15.0, conditions));
    assert!(all[0][0].holds);
    assert_relative_eq!(time(&all[0][0]), 297_179.203, max_relative = 2e-3);
    let mean = result(&all[1], ONE_TERM);
    assert!(!mean.holds && mean.validity.starts_with("Fourier number 0.18, not above 0.2"), "{mean:?}");
    assert!(!result(&all[2], ONE_TERM).holds, "Fourier number 0.08");
    assert!(all.iter().flatten().filter(|result| result.name == LUMPED).all(|result| !result.holds));
}

#[test]
fn a_ball_in_a_bath_and_a_sheet_in_hot_water() {
    let conditions = r#"{"what": "hottest", "below_c": 60}, {"what": "face", "of": "outer", "below_c": 60}"#;
    let ball = one_layer("sphere", 0.04, 2.0, 3600.0, 900.0);
    let all = hand(&ball, &in_air(900.0, 5000.0, 25.0, conditions));
    assert_relative_eq!(time(&all[0][0]), 1_048.114_8, max_relative = 1e-5);
    let too_curved = result(&all[1], THICK);
    assert!(!too_curved.holds && too_curved.validity.contains("too curved"), "{too_curved:?}");

    let conditions = r#"{"what": "coldest", "above_c": 90}, {"what": "mean", "above_c": 29}"#;
    let sheet = one_layer("slab", 0.02, 0.25, 1200.0, 1500.0);
    let all = hand(&sheet, &in_air(20.0, 1250.0, 100.0, conditions));
    assert_relative_eq!(time(&all[0][0]), 2_763.431_64, max_relative = 1e-6);
    assert!(all[1].iter().all(|result| result.name == STEADY || !result.holds), "{:?}", all[1]);
}

#[test]
fn two_equal_faces_are_a_half_with_an_insulated_middle() {
    let rest = r#""start": {"uniform_c": 400},
        "surroundings": {"inner": [{"temperature_c": 20, "film_w_per_m2_k": 12}],
                         "outer": [{"temperature_c": 20, "film_w_per_m2_k": 12}]},
        "ready_when": [{"what": "hottest", "below_c": 60}, {"what": "face", "of": "inner", "below_c": 45},
                       {"what": "probe", "of": "middle", "below_c": 60}],
        "probes": [{"name": "middle", "from_inside_m": 0.2}]"#;
    let all = hand(&one_layer("slab", 0.4, 0.7, 1800.0, 840.0), rest);
    for (results, truth) in all.iter().zip([140_554.244, 105_107.991, 140_554.244]) {
        assert_eq!((results[0].name, results[0].holds), (ONE_TERM, true));
        assert_relative_eq!(time(&results[0]), truth, max_relative = 1e-7);
    }
}

#[test]
fn a_thick_foundation_held_cold_in_warm_air_and_under_a_panel() {
    let wall = one_layer("slab", 2.0, 1.4, 2300.0, 880.0);
    let asked = |start: f64, outer: &str, depth: f64, condition: &str| {
        let rest = format!(
            r#""start": {{"uniform_c": {start}}}, "surroundings": {{"outer": [{outer}]}},
            "probes": [{{"name": "p", "from_outside_m": {depth}}}],
            "ready_when": [{{"what": "probe", "of": "p", {condition}}}]"#
        );
        hand(&wall, &rest).remove(0)
    };
    let film = r#"{"temperature_c": 60, "film_w_per_m2_k": 15}"#;
    let panel = r#"{"heat_flux_into_w_per_m2": 900}"#;
    for (results, truth) in [
        (asked(60.0, r#"{"held_c": 5}"#, 0.1, r#""below_c": 40"#), 8_758.765_42),
        (asked(5.0, film, 0.05, r#""above_c": 20"#), 7_555.721_45),
        (asked(18.0, panel, 0.03, r#""above_c": 40"#), 4_015.620_56),
        (asked(18.0, panel, 0.0, r#""above_c": 60"#), 4_846.653_67),
    ] {
        assert_eq!((results[0].name, results[0].holds), (THICK, true), "{results:?}");
        assert_relative_eq!(time(&results[0]), truth, max_relative = 1e-8);
    }
}

#[test]
fn a_glowing_plate_by_radiation_alone() {
    let rest = r#""start": {"uniform_c": 826.85},
        "surroundings": {"outer": [{"temperature_c": 20, "emissivity": 0.5}]},
        "ready_when": [{"what": "hottest", "below_c": 126.85}]"#;
    let all = hand(&one_layer("slab", 0.001, 400.0, 8000.0, 500.0), rest);
    let lumped = result(&all[0], LUMPED);
    assert!(lumped.holds && lumped.formula.contains("arctan"), "{lumped:?}");
    assert_relative_eq!(time(lumped), 811.517_135, max_relative = 1e-8);
}

#[test]
fn a_wall_held_hot_never_gets_colder_outside_than_it_settles() {
    let rest = r#""start": {"uniform_c": 726.85},
        "surroundings": {"inner": [{"held_c": 726.85}], "outer": [{"temperature_c": 26.85, "emissivity": 0.98}]},
        "ready_when": [{"what": "face", "of": "outer", "below_c": 600}]"#;
    let all = hand(&one_layer("slab", 0.1, 55.6, 7850.0, 480.0), rest);
    assert_eq!((all[0][0].name, all[0][0].holds), (STEADY, true));
    // NAFEMS T2, recomputed.
    match all[0][0].gives {
        Gives::Never { settles_at } => assert_relative_eq!(settles_at, 927.004, epsilon = 0.001),
        Gives::Time(_) | Gives::Temperature(_) => panic!("{:?}", all[0][0]),
    }
}

#[test]
fn what_lies_beyond_the_surroundings_is_never_reached_by_any_formula() {
    let conditions = r#"{"what": "mean", "below_c": 10}"#;
    let all = hand(&one_layer("slab", 0.05, 45.0, 7850.0, 480.0), &in_air(650.0, 18.0, 20.0, conditions));
    assert_eq!(all[0][0].name, STEADY);
    for result in &all[0] {
        match result.gives {
            Gives::Never { settles_at } => assert_relative_eq!(settles_at, kelvin(20.0), epsilon = 1e-6),
            Gives::Time(_) | Gives::Temperature(_) => panic!("{result:?}"),
        }
    }
}

#[test]
fn a_still_filling_in_a_lagged_vessel() {
    let item =
        VESSEL.replace(r#""motion": "self-mixing", "inside_film_w_per_m2_k": 300"#, r#""motion": "still""#);
    let conditions = r#"{"what": "hottest", "of": "contents", "below_c": 60},
        {"what": "mean", "of": "contents", "below_c": 50}"#;
    let all = hand(&item, &in_air(92.0, 9.0, 18.0, conditions));
    for (results, truth) in all.iter().zip([1_150_976.64, 1_492_710.38]) {
        assert_eq!((results[0].name, results[0].holds), (ONE_TERM, true), "{results:?}");
        assert!(results[0].validity.contains("the layers around it hold 3 % of the heat"), "{results:?}");
        // What the steel and the wool store, 3 to 4 %, counts by a quotient that knows it to a tenth or so.
        assert_relative_eq!(time(&results[0]), truth, max_relative = 5e-3);
    }
}

#[test]
fn water_that_mixes_itself_is_one_temperature_behind_its_lagging() {
    let rest = r#""start": {"steady_before": {"contents_c": 92, "outer": {"temperature_c": 18,
            "film_w_per_m2_k": 8, "emissivity": 0.25}}},
        "surroundings": {"outer": [{"temperature_c": 18, "film_w_per_m2_k": 8, "emissivity": 0.25}]},
        "ready_when": [{"what": "hottest", "of": "contents", "below_c": 60}]"#;
    let all = hand(VESSEL, rest);
    let first = &all[0][0];
    assert_eq!((first.name, first.holds), (LUMPED, true), "{first:?}");
    assert!(first.validity.starts_with("the contents are mixed; the layers around it hold"), "{first:?}");
    // About 248 h for the water alone behind the resistance of the lagging; the film adds to the
    // resistance, wall and wool to what is stored.
    let hours = time(first) / 3600.0;
    assert!((248.0..275.0).contains(&hours), "{hours} h");
    assert!(all[0].iter().all(|result| result.name != ONE_TERM), "a series knows no motion");
}

#[test]
fn surroundings_that_change_before_the_answer_are_not_counted_and_that_is_said() {
    let rest = |from: f64| {
        format!(
            r#""start": {{"uniform_c": 200}}, "surroundings": {{"outer": [
                {{"temperature_c": 25, "film_w_per_m2_k": 6}},
                {{"from_s": {from}, "temperature_c": 30, "film_w_per_m2_k": 35}}]}},
            "ready_when": [{{"what": "hottest", "below_c": 50}}]"#
        )
    };
    let ball = one_layer("sphere", 0.12, 0.8, 2000.0, 1000.0);
    let early = hand(&ball, &rest(7200.0)).remove(0);
    let one_term = result(&early, ONE_TERM);
    assert!(!one_term.holds);
    assert!(one_term.validity.ends_with("surroundings change at 2 h: not counted"), "{one_term:?}");
    // Where it settles is that of the last surroundings.
    match result(&early, STEADY).gives {
        Gives::Temperature(settles) => assert_relative_eq!(settles, kelvin(30.0), epsilon = 1e-6),
        Gives::Time(_) | Gives::Never { .. } => panic!("{early:?}"),
    }
    let late = hand(&ball, &rest(720_000.0)).remove(0);
    assert!(result(&late, ONE_TERM).holds, "{late:?}");
}

#[test]
fn with_all_faces_insulated_the_heat_is_shared_out() {
    let item = r#"{"shape": "slab", "layers": [
        {"thickness_m": 0.05, "density_kg_per_m3": 7850, "conductivity_w_per_m_k": 40,
         "heat_capacity_j_per_kg_k": {"polynomial_in_c": [450, 0.3], "from_c": 0, "to_c": 1000}},
        {"thickness_m": 0.15, "density_kg_per_m3": 2300, "conductivity_w_per_m_k": 1.5,
         "heat_capacity_j_per_kg_k": {"polynomial_in_c": [800, 0.6], "from_c": 0, "to_c": 1000}}]}"#;
    let rest = r#""start": {"per_layer_c": [800, 20]}, "surroundings": {},
        "ready_when": [{"what": "hottest", "below_c": 400}]"#;
    let all = hand(item, rest);
    // S06: 360.969997 °C by the heat balance.
    match result(&all[0], STEADY).gives {
        Gives::Temperature(settles) => assert_relative_eq!(settles, kelvin(360.969_997), epsilon = 1e-6),
        Gives::Time(_) | Gives::Never { .. } => panic!("{all:?}"),
    }
}

#[test]
fn a_given_flux_warms_steadily() {
    let rest = r#""start": {"uniform_c": 20}, "surroundings": {"outer": [{"heat_flux_into_w_per_m2": 8000}]},
        "ready_when": [{"what": "mean", "above_c": 120}]"#;
    let all = hand(&one_layer("slab", 0.02, 50.0, 7850.0, 470.0), rest);
    let lumped = result(&all[0], LUMPED);
    assert!(lumped.holds && lumped.validity.starts_with("the flux puts 1.6 K across it"), "{lumped:?}");
    assert_relative_eq!(time(lumped), 7850.0 * 470.0 * 0.02 * 100.0 / 8000.0, max_relative = 1e-9);
    assert!(all[0].iter().all(|result| result.name != STEADY), "it settles nowhere");
}

#[test]
fn a_difference_and_a_rate_decay_with_the_first_term() {
    let conditions = r#"{"what": "difference", "below_k": 10}, {"what": "rate", "below_k_per_h": 5},
        {"what": "hottest", "below_c": 60}"#;
    let lining = one_layer("slab", 0.2, 0.7, 1800.0, 840.0);
    let all = hand(&lining, &in_air(400.0, 12.0, 20.0, conditions));
    let times: Vec<f64> = all.iter().map(|results| time(result(results, ONE_TERM))).collect();
    // From the temperatures of the same term: hottest 60 °C leaves 40 K, of which cos(zeta) at the face.
    let term = crate::scale::series::OneTerm::new(crate::scale::series::Body::Slab, 12.0 * 0.2 / 0.7);
    let per_second = term.root * term.root * 0.7 / (1800.0 * 840.0 * 0.04);
    let difference = 40.0 * (1.0 - libm::cos(term.root));
    assert_relative_eq!(times[0] - times[2], libm::log(difference / 10.0) / per_second, max_relative = 1e-6);
    let rate = 40.0 * term.mean() / term.at(0.0) * per_second * 3600.0;
    assert_relative_eq!(times[1] - times[2], libm::log(rate / 5.0) / per_second, max_relative = 1e-6);
}

#[test]
fn of_a_condition_that_holds_from_the_start_only_where_it_settles_is_said() {
    let conditions = r#"{"what": "hottest", "below_c": 700}"#;
    let all = hand(&one_layer("slab", 0.05, 45.0, 7850.0, 480.0), &in_air(650.0, 18.0, 20.0, conditions));
    assert_eq!(all[0].len(), 1);
    assert_eq!(all[0][0].name, STEADY);
    assert!(matches!(all[0][0].gives, Gives::Temperature(_)));
}

#[test]
fn a_start_that_is_not_uniform_is_said() {
    let rest = r#""start": {"profile": [{"from_inside_m": 0, "temperature_c": 500},
                                          {"from_inside_m": 0.2, "temperature_c": 300}]},
        "surroundings": {"outer": [{"temperature_c": 20, "film_w_per_m2_k": 12}]},
        "ready_when": [{"what": "hottest", "below_c": 60}]"#;
    let all = hand(&one_layer("slab", 0.2, 0.7, 1800.0, 840.0), rest);
    let one_term = result(&all[0], ONE_TERM);
    assert!(!one_term.holds && one_term.validity.contains("the start is not uniform"), "{one_term:?}");
    // Its mean is 400 °C.
    assert_relative_eq!(time(one_term), 140_554.244, max_relative = 1e-6);
}
