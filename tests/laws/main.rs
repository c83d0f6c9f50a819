//! Laws that hold for any scenario, on random ones; always the same ones, from a fixed seed.

mod any;
mod dice;
mod plain;

use any::{Any, any};
use dice::dice;
use plain::{Plain, plain};
use proptest::prelude::*;
use proptest::test_runner::{Config, RngAlgorithm, TestRng, TestRunner};
use serde_json::{Value, json};
use stillheat::Solved;
use stillheat::answer::{March, Outcome};

/// Scenarios of every kind.
const ANY: u32 = 300;
/// Pairs of scenarios that must answer alike.
const PAIRS: u32 = 100;

fn check<S: Strategy>(cases: u32, strategy: &S, law: impl Fn(S::Value) -> Result<(), TestCaseError>) {
    let config = Config { cases, failure_persistence: None, max_shrink_iters: 2000, ..Config::default() };
    let seed = TestRng::deterministic_rng(RngAlgorithm::ChaCha);
    if let Err(found) = TestRunner::new_with_rng(config, seed).run(strategy, law) {
        panic!("{found}");
    }
}

fn solve(file: &Value) -> Result<Solved, TestCaseError> {
    stillheat::solve(&file.to_string())
        .map_err(|problems| TestCaseError::fail(format!("{problems:?}\n{file}")))
}

fn marches(solved: &Solved) -> [&March; 2] {
    [&solved.resolved.coarse, &solved.resolved.fine]
}

#[test]
fn any_scenario_ends_with_numbers_balances_its_heat_and_stays_between_its_drivers() {
    check(ANY, &dice().prop_map(|rolls| any(&rolls)), |any| {
        let solved = solve(&any.file)?;
        says_numbers(&any, &solved)?;
        balances(&any, &solved)?;
        stays_between(&any, &solved)?;
        saves(&any, &solved)
    });
}

fn says_numbers(any: &Any, solved: &Solved) -> Result<(), TestCaseError> {
    let words = format!("{:?}", solved.report);
    for wrong in ["NaN", "inf,", "inf ", "inf)", "inf]"] {
        prop_assert!(!words.contains(wrong), "{wrong} in {words}\n{}", any.file);
    }
    Ok(())
}

fn balances(any: &Any, solved: &Solved) -> Result<(), TestCaseError> {
    let error = solved.report.heat_balance.relative_error;
    let allowed = if any.constant { 1e-9 } else { 1e-6 };
    prop_assert!(error < allowed, "balance open by {error:e}\n{}", any.file);
    Ok(())
}

/// Nothing is hotter or colder than what drives it, by more than a step may be wrong.
fn stays_between(any: &Any, solved: &Solved) -> Result<(), TestCaseError> {
    let (low, high) = (any.extent.0 + 273.15, any.extent.1 + 273.15);
    for (march, tolerance) in marches(solved).into_iter().zip(solved.resolved.tolerances) {
        for &time in march.history.times() {
            for temperature in march.history.temperatures(time) {
                prop_assert!(temperature.is_finite());
                let colder = low - temperature;
                let hotter = temperature - high;
                prop_assert!(
                    any.cooled || colder <= tolerance,
                    "{colder} K too cold at {time} s\n{}",
                    any.file
                );
                prop_assert!(
                    any.heated || hotter <= tolerance,
                    "{hotter} K too hot at {time} s\n{}",
                    any.file
                );
            }
        }
    }
    Ok(())
}

/// Saved, it is what was opened; reopened, it is the same question, to which there is one answer.
fn saves(any: &Any, solved: &Solved) -> Result<(), TestCaseError> {
    let saved = serde_json::to_value(&solved.scenario).map_err(|e| TestCaseError::fail(e.to_string()))?;
    prop_assert!(same(&saved, &any.file), "{}\n{saved}", any.file);
    let reopened = stillheat::scenario::read(&saved.to_string());
    prop_assert_eq!(reopened.as_ref(), Ok(&solved.scenario));
    Ok(())
}

/// The same document, however its numbers and the order of its keys are written.
fn same(one: &Value, other: &Value) -> bool {
    match (one, other) {
        (Value::Number(one), Value::Number(other)) => one.as_f64() == other.as_f64(),
        (Value::Array(one), Value::Array(other)) => {
            one.len() == other.len() && one.iter().zip(other).all(|(one, other)| same(one, other))
        }
        (Value::Object(one), Value::Object(other)) => {
            let matches = |(key, value)| other.get(key).is_some_and(|other| same(value, other));
            one.len() == other.len() && one.iter().all(matches)
        }
        _ => one == other,
    }
}

/// Time and band of every condition; all are reached in a plain scenario.
fn bands(solved: &Solved) -> Result<Vec<(f64, f64)>, TestCaseError> {
    let band = |outcome: &Outcome| match outcome {
        Outcome::At { low_s, high_s, .. } => Ok((*low_s, *high_s)),
        other => Err(TestCaseError::fail(format!("not reached: {other:?}"))),
    };
    solved.report.ready_when.iter().map(|report| band(&report.outcome)).collect()
}

/// Do the bands of two scenarios meet, when the times of the first are taken this many times?
fn meet(first: &Plain, second: &Value, times: f64) -> Result<(), TestCaseError> {
    let (of_first, of_second) = (bands(&solve(&first.file)?)?, bands(&solve(second)?)?);
    for ((low, high), (other_low, other_high)) in of_first.into_iter().zip(of_second) {
        let meets = times * low <= other_high && other_low <= times * high;
        let (low, high) = (times * low, times * high);
        prop_assert!(meets, "{low} to {high} against {other_low} to {other_high}\n{}\n{second}", first.file);
    }
    Ok(())
}

fn pairs(law: impl Fn(Plain) -> Result<(), TestCaseError>) {
    check(PAIRS, &dice().prop_map(|rolls| plain(&rolls)), law);
}

#[test]
fn a_weaker_film_is_never_ready_sooner() {
    pairs(|plain| {
        let weaker = plain.with_film(0.7);
        let (strong, weak) = (bands(&solve(&plain.file)?)?, bands(&solve(&weaker)?)?);
        for ((low, _), (_, high)) in strong.into_iter().zip(weak) {
            prop_assert!(high >= low, "{high} s against {low} s\n{}", plain.file);
        }
        Ok(())
    });
}

#[test]
fn one_factor_on_capacities_conductances_and_films_leaves_all_times() {
    pairs(|plain| meet(&plain, &plain.scaled(0.6, 0.6, 1.0, 0.6), 1.0));
}

#[test]
fn one_factor_on_capacities_alone_stretches_all_times() {
    pairs(|plain| meet(&plain, &plain.scaled(1.7, 1.0, 1.0, 1.0), 1.7));
}

#[test]
fn a_larger_item_of_as_much_resistance_and_capacity_leaves_all_times() {
    // Twice as thick, twice the conductivity, half the capacity: each layer resists and holds as before.
    pairs(|plain| meet(&plain, &plain.scaled(0.5, 2.0, 2.0, 1.0), 1.0));
}

#[test]
fn a_layer_in_two_pieces_answers_the_same() {
    pairs(|plain| meet(&plain, &plain.with_first_layer_split(), 1.0));
}

#[test]
fn a_slab_turned_inside_out_answers_the_same() {
    pairs(|plain| {
        let mut slab = plain.file.clone();
        slab["item"]["shape"] = json!("slab");
        if let Some(item) = slab["item"].as_object_mut() {
            item.remove("inner_radius_m");
        }
        let plain = Plain { file: slab };
        let turned = plain.turned();
        meet(&plain, &turned, 1.0)
    });
}
