//! When is a hot (or cold) item at rest ready, how long may it stand, and what would it take?
//!
//! One straight line, each arrow a plain function:
//!
//! ```text
//! scenario (JSON) -> item (SI, checked) -> mesh -> march / steady -> answer -> report, pictures
//! ```
//!
//! The core is a pure function of the scenario: no clock, no randomness, no files, no globals.

pub mod answer;
pub mod conduct;
pub mod film;
pub mod item;
pub mod matter;
pub mod mesh;
pub mod picture;
pub mod problem;
pub mod scale;
pub mod scenario;
pub mod units;

#[cfg(any(test, target_arch = "wasm32"))]
mod page;

use answer::{Circumstances, Report, Resolved};
use item::{Checked, Item};
use problem::{Problem, Trouble};
use scenario::Scenario;

/// A scenario with its answer.
#[derive(Clone, Debug)]
pub struct Solved {
    /// As written.
    pub scenario: Scenario,
    /// As checked.
    pub checked: Checked,
    /// The marches behind the answer.
    pub resolved: Resolved,
    /// What is said about it.
    pub report: Report,
}

/// The whole line: the text of a scenario to its answer.
///
/// # Errors
/// Everything that is wrong with the text, each problem with its place.
pub fn solve(text: &str) -> Result<Solved, Vec<Problem>> {
    let (scenario, checked) = checked(text)?;
    let resolved = answer::resolve(&checked.item).map_err(|error| {
        let words = format!("the steady state of the earlier surroundings was not found ({error})");
        vec![Problem::error("/start/steady_before", Trouble::Contradiction { words })]
    })?;
    let (item, clock) = (&checked.item, checked.clock);
    let (by_hand, disagreements) = answer::by_hand(item, &resolved, clock);
    let mut warnings = checked.warnings.clone();
    warnings.extend(answer::still_liquid_warnings(item, &checked.still_liquids, &resolved, clock));
    warnings.extend(disagreements);
    let about = Circumstances { title: checked.title.clone(), clock, warnings, by_hand };
    let report = answer::report(&checked.item, &resolved, about);
    Ok(Solved { scenario, checked, resolved, report })
}

/// What is written, read and checked; all problems of both at once.
fn checked(text: &str) -> Result<(Scenario, Checked), Vec<Problem>> {
    let (scenario, problems) = scenario::attempt(text);
    let Some(scenario) = scenario else { return Err(problem::together(problems, Vec::new())) };
    match Item::check(&scenario) {
        Ok(checked) if problems.is_empty() => Ok((scenario, checked)),
        Ok(_) => Err(problem::together(problems, Vec::new())),
        Err(more) => Err(problem::together(problems, more)),
    }
}
