//! Hand formulas beside the computed answer, and a word where they disagree though they should not.

use super::report::HandFormula;
use super::resolve::Resolved;
use super::verdict::Verdict;
use super::{all_of, words};
use crate::item::{Condition, Item};
use crate::problem::{Problem, Trouble};
use crate::scale::hand::{Gives, formulas};
use crate::units::clock::Clock;
use crate::units::words as units_words;

/// A formula that holds and is further off than this is worth a word: its own limits let through 8 %.
const OFF: f64 = 0.1;

/// The formulas for the condition that decides when it is ready, and for the limit that is crossed first.
pub fn by_hand(item: &Item, resolved: &Resolved, clock: Option<Clock>) -> (Vec<HandFormula>, Vec<Problem>) {
    let (mut all, mut warnings) = (Vec::new(), Vec::new());
    let (ready, limits) = resolved.followed.split_at(item.ready_when().len());
    let last = |a: f64, b: f64| a > b;
    let first = |a: f64, b: f64| a < b;
    let decisive = [
        decides(item.ready_when(), ready, resolved, last),
        decides(item.must_not(), limits, resolved, first),
    ];
    for (condition, computed) in decisive.into_iter().flatten() {
        for found in formulas(item, condition) {
            if let (Gives::Time(time), Some(computed), true) = (found.gives, computed, found.holds)
                && (time - computed).abs() > OFF * computed
            {
                warnings.push(disagreement(condition, found.name, time, computed));
            }
            all.push(HandFormula {
                name: found.name,
                formula: found.formula,
                holds: found.holds,
                validity: found.validity,
                gives: gives(found.gives, condition, clock),
                time_s: match found.gives {
                    Gives::Time(time) => Some(time),
                    Gives::Temperature(_) | Gives::Never { .. } => None,
                },
                path: condition.path.clone(),
            });
        }
    }
    (all, warnings)
}

/// The condition that counts, with its computed time; one that is never reached counts before all others.
fn decides<'a>(
    conditions: &'a [Condition],
    followed: &[super::Followed],
    resolved: &Resolved,
    before: impl Fn(f64, f64) -> bool,
) -> Option<(&'a Condition, Option<f64>)> {
    let mut best: Option<(&Condition, Option<f64>)> = None;
    for (condition, one) in conditions.iter().zip(followed) {
        let time = match all_of(std::slice::from_ref(one), resolved.coarse.ending) {
            Verdict::Already { .. } => Some(0.0),
            Verdict::At { moment, .. } => Some(moment.time),
            Verdict::Never | Verdict::NotWithin => None,
        };
        let comparable = |time: Option<f64>| time.unwrap_or(f64::INFINITY);
        if best.is_none_or(|(_, other)| before(comparable(time), comparable(other))) {
            best = Some((condition, time));
        }
    }
    best
}

fn gives(found: Gives, condition: &Condition, clock: Option<Clock>) -> String {
    match found {
        Gives::Time(time) if clock.is_some() => {
            format!("{} ({})", words::when(time, clock), units_words::duration(time))
        }
        Gives::Time(time) => words::when(time, clock),
        Gives::Temperature(value) => format!("settles at {}", words::quantity(condition, value)),
        Gives::Never { settles_at } => {
            format!("never: settles at {}", words::quantity(condition, settles_at))
        }
    }
}

fn disagreement(condition: &Condition, name: &str, by_hand: f64, computed: f64) -> Problem {
    Problem::warning(
        condition.path.clone(),
        Trouble::Unusual {
            words: format!(
                "by hand ({name}) it takes {}, computed {}; the formula seems to hold, so they should agree",
                units_words::duration(by_hand),
                units_words::duration(computed)
            ),
            hint: "Look at the description again before trusting either.".to_owned(),
        },
    )
}
