//! What a pocket calculator says: for one condition, the hand formulas that fit an item, with their validity.

mod around;
mod body;
mod fitted;
mod layout;
mod one_temperature;
mod one_term;
mod settled;
mod surroundings;
mod thick_wall;
mod verdict;
mod view;

use crate::item::{Condition, Item, Sense, Watch};
use verdict::Found;
use view::View;

/// One hand formula worked out for one condition.
#[derive(Clone, Debug, PartialEq)]
pub struct HandResult {
    /// Which: "one temperature throughout", "one term of the series", "thick wall", "steady".
    pub name: &'static str,
    /// The formula and its source.
    pub formula: &'static str,
    /// Does it hold for this item? Then it lies within 10 % of the computed time, nearly always within 4 %
    /// (held by `tests/hand_formulas.rs`).
    pub holds: bool,
    /// Why, or why not, without full stop: "Biot number 0.03, below 0.1".
    pub validity: String,
    /// What it gives.
    pub gives: Gives,
}

/// What a hand formula gives.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Gives {
    /// When the condition is reached, s after the stop.
    Time(f64),
    /// Where the watched quantity settles, K; of a difference in K.
    Temperature(f64),
    /// The condition is never reached.
    Never {
        /// Where the watched quantity settles, K; of a difference in K, of a rate in K/s.
        settles_at: f64,
    },
}

impl Gives {
    /// Is it a number? A time that lies within rounding of never is none.
    fn is_sound(self) -> bool {
        match self {
            Self::Time(time) => time.is_finite() && time >= 0.0,
            Self::Temperature(value) | Self::Never { settles_at: value } => value.is_finite(),
        }
    }
}

/// The hand formulas for a condition: those that hold first, of these the most exact.
///
/// A formula that has nothing to say about the item (a series for a stirred vessel) is left out; of a condition
/// that holds from the start only where it settles is said.
pub fn formulas(item: &Item, condition: &Condition) -> Vec<HandResult> {
    let view = View::new(item);
    let with_time: [Formula; 3] =
        [one_temperature::one_temperature, one_term::one_term, thick_wall::thick_wall];
    let mut all: Vec<Found> = settled::settled(&view, condition).into_iter().collect();
    let rises_first = matches!(condition.watch, Watch::Difference(_) | Watch::Rate(_));
    if rises_first || !view.holds_at_start(condition) {
        all.extend(with_time.into_iter().filter_map(|formula| formula(&view, condition)));
    }
    all.retain(|found| found.result.gives.is_sound());
    all.sort_by(|a, b| a.rank().total_cmp(&b.rank()));
    all.into_iter().map(|found| found.result).collect()
}

/// A formula worked out for a condition; none where it has nothing to say.
type Formula = fn(&View<'_>, &Condition) -> Option<Found>;

/// Is this value on the wanted side of the limit?
fn reached(condition: &Condition, value: f64) -> bool {
    match condition.sense {
        Sense::Below => value < condition.limit,
        Sense::Above => value > condition.limit,
    }
}

/// The temperature that matters as the end of the way: the limit, where it lies on it.
fn towards(condition: &Condition, start: f64, settles: f64) -> f64 {
    match condition.watch {
        Watch::Difference(_) | Watch::Rate(_) => settles,
        Watch::Hottest(_) | Watch::Coldest(_) | Watch::Mean(_) | Watch::Place(_) | Watch::Face(_) => {
            condition.limit.clamp(start.min(settles), start.max(settles))
        }
    }
}

#[cfg(test)]
mod tests;
