//! The answer as it leaves the core: what the page shows and what the batch command writes.
//!
//! Temperatures leave in °C, times in s after the stop, and, where `stopped_at` is given, as local date and
//! time. Words are made here and nowhere else, so that page, batch and sheet say the same.

use crate::problem::Problem;
use serde::Serialize;

/// Everything that is said about one scenario.
#[derive(Clone, Debug, Serialize)]
pub struct Report {
    /// Version of the format.
    pub stillheat: u64,
    /// What the question is called.
    pub title: String,
    /// The answer in one short line: "Ready Tuesday 14:20".
    pub headline: String,
    /// The second line: "2 days 8 h after the stop; stays ready".
    pub detail: String,
    /// When all of `ready_when` hold; none where nothing was asked.
    pub ready: Option<Outcome>,
    /// Each of `ready_when`.
    pub ready_when: Vec<ConditionReport>,
    /// When the first of `must_not` happens; none where nothing was asked.
    pub standing: Option<Outcome>,
    /// Each of `must_not`.
    pub must_not: Vec<ConditionReport>,
    /// Where the heat went.
    pub heat_balance: HeatBalance,
    /// Hand formulas, the nearest first.
    pub by_hand: Vec<HandFormula>,
    /// Temperatures at time zero and where it ends.
    pub course: Course,
    /// How far to trust the calculation, as (what, how much) in words.
    pub checks: Vec<(&'static str, String)>,
    /// What it took to compute.
    pub effort: Effort,
    /// Warnings: allowed, but unusual or worth knowing.
    pub warnings: Vec<Problem>,
    /// Cautions that go with this item: hot surfaces, opening, freezing.
    pub cautions: Vec<String>,
}

/// One condition and what became of it.
#[derive(Clone, Debug, Serialize)]
pub struct ConditionReport {
    /// JSON Pointer to where it is written.
    pub path: String,
    /// "hottest of the contents below 60 °C"
    pub words: String,
    /// What became of it.
    pub outcome: Outcome,
    /// The outcome in words: "Tuesday 14:20", "from the start", "never: it settles at 63.2 °C".
    pub outcome_words: String,
}

/// What became of a condition, or of all of them together.
#[derive(Clone, Debug, Serialize)]
#[serde(tag = "kind", rename_all = "snake_case")]
pub enum Outcome {
    /// It holds from the start.
    Already {
        /// When it is lost again, s; none where it stays.
        lost_again_s: Option<f64>,
        /// From when on it holds to the end, s, where that is later.
        for_good_from_s: Option<f64>,
    },
    /// It is reached.
    At {
        /// s after the stop, extrapolated from two meshes.
        time_s: f64,
        /// Lower end of the numerical band, s.
        low_s: f64,
        /// Upper end of the numerical band, s.
        high_s: f64,
        /// Local date and time, "2026-03-03T14:20", where `stopped_at` is given.
        #[serde(skip_serializing_if = "Option::is_none")]
        clock: Option<String>,
        /// When it is lost again, s; none where it stays.
        lost_again_s: Option<f64>,
        /// From when on it holds to the end, s, where that is later.
        for_good_from_s: Option<f64>,
        /// Temperatures at that moment.
        state: State,
    },
    /// It is never reached: everything settles before.
    Never {
        /// Where the watched quantity settles, or, where all repeats itself, the nearest it comes to the limit,
        /// in the unit of the limit (°C, K or K/h); none for all together.
        settles_at: Option<f64>,
    },
    /// It is not reached within the time looked ahead.
    NotWithin {
        /// How far was looked, s.
        look_ahead_s: f64,
        /// The watched quantity then, in the unit of the limit (°C, K or K/h); none for all together.
        then: Option<f64>,
    },
}

/// The item at one moment.
#[derive(Clone, Debug, Serialize)]
pub struct State {
    /// Hottest of the whole item, °C.
    pub hottest_c: f64,
    /// Coldest of the whole item, °C.
    pub coldest_c: f64,
    /// Mean of each layer, from the inside out, °C.
    pub layer_means_c: Vec<f64>,
    /// Inner face (or centre), °C.
    pub inside_c: f64,
    /// Outer face, °C.
    pub outside_c: f64,
}

/// Stored = in through the faces + released, from the start to the end of the march. Per m² of a slab, per m
/// of a cylinder, the whole sphere.
#[derive(Clone, Debug, Serialize)]
pub struct HeatBalance {
    /// "per m² of face", "per m of length", "for the whole".
    pub per: &'static str,
    /// Until when, s.
    pub until_s: f64,
    /// Change of the heat stored, J.
    pub stored_j: f64,
    /// In through the inner face, J.
    pub in_inner_j: f64,
    /// In through the outer face, J.
    pub in_outer_j: f64,
    /// |stored - in| over the heat that moved through the faces or inside, at least that of 0.1 K throughout.
    pub relative_error: f64,
}

/// A formula somebody can check with a pocket calculator.
#[derive(Clone, Debug, Serialize)]
pub struct HandFormula {
    /// Which: "one temperature throughout", "one term of the series", "thick wall", "steady".
    pub name: &'static str,
    /// The formula and its source.
    pub formula: &'static str,
    /// Does it hold for this item?
    pub holds: bool,
    /// Why, or why not: "Biot number 0.03, below 0.1".
    pub validity: String,
    /// What it gives, in words with unit.
    pub gives: String,
    /// The time it gives, s, where it gives one.
    pub time_s: Option<f64>,
    /// Which condition it was worked out for: JSON Pointer; empty for none.
    pub path: String,
}

/// Where it starts and where it ends.
#[derive(Clone, Debug, Serialize)]
pub struct Course {
    /// At time zero.
    pub start: State,
    /// At the end of what was computed.
    pub end: State,
    /// End of what was computed and is drawn, s.
    pub end_s: f64,
    /// Has everything settled by the end of the look-ahead?
    pub settles: bool,
}

/// What it took to compute; the same on every machine.
#[derive(Clone, Debug, Serialize)]
pub struct Effort {
    /// Nodes of the coarse and the fine mesh.
    pub nodes: [usize; 2],
    /// Tolerance of the two runs, K.
    pub tolerance_k: [f64; 2],
    /// Accepted time steps, both runs.
    pub steps: usize,
    /// Rejected time steps, both runs.
    pub rejected: usize,
}
