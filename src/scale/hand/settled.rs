//! Where everything settles: resistances in series, applied to an item.

use super::surroundings;
use super::verdict::{Found, Verdict};
use super::view::{View, settles};
use super::{Gives, reached};
use crate::item::{Condition, Watch};
use crate::scale::chain::{End, Outside};

const NAME: &str = "steady";
const IN_SERIES: &str = "Q = (T inside - T outside) / sum of resistances; of a layer s/(k A), ln(b/a)/(2 pi k L) or \
    (1/a - 1/b)/(4 pi k), of a film 1/(h A), with radiation balanced at the face (any heat-transfer text; \
    Carslaw and Jaeger 1959, sections 3.2, 7.2, 9.2)";
const SHARED_OUT: &str =
    "sum of C (T - T start) over the layers = 0: heat shared out, none lost (any heat-transfer text)";

/// The temperature where the watched quantity settles; none for a rate, and where nothing settles.
pub fn settled(view: &View<'_>, condition: &Condition) -> Option<Found> {
    let layout = &view.layout;
    let ends = surroundings::in_the_long_run(view.item());
    let nodes = settles(layout, ends, &view.start)?;
    let value = layout.watched(condition.watch, &nodes)?;
    let mut verdict = Verdict::new();
    let draws = ends.iter().any(|end| end.outside.draws());
    let later = surroundings::change_later(view.item());
    verdict.say(true, basis(draws, later));
    let changing = surroundings::go_on_changing(view.item());
    let mean = "the surroundings go on changing: their mean is counted";
    verdict.object(changing.then(|| mean.to_owned()));
    let never = !reached(condition, value) && !later && !changing && only_nearer(view, condition);
    let gives = if never { Gives::Never { settles_at: value } } else { Gives::Temperature(value) };
    Some(verdict.found(NAME, if draws { IN_SERIES } else { SHARED_OUT }, gives))
}

/// Can the watched quantity only come nearer to where it settles, or at least never reach the limit?
///
/// An even start that everything drives to the same side comes nearer without turning (comparison principle).
/// Else no temperature leaves the range of start and surroundings (maximum principle), unless a flux drives it.
fn only_nearer(view: &View<'_>, condition: &Condition) -> bool {
    if view.holds_at_start(condition) {
        return false;
    }
    let drives: Vec<(f64, f64)> = view.now.iter().filter_map(drives_to).collect();
    if view.begins_even() {
        let start = view.start[0].mean;
        let up = drives.iter().all(|&(low, _)| low >= start);
        let down = drives.iter().all(|&(_, high)| high <= start);
        if up || down {
            return true;
        }
    }
    let begins = view.start.iter().flat_map(|began| {
        let [inner, outer] = began.sides;
        [inner, outer, began.mean - began.spread, began.mean + began.spread]
    });
    let ends = drives.iter().flat_map(|&(low, high)| [low, high]);
    let possible = begins.chain(ends).any(|temperature| reached(condition, temperature));
    !possible && !matches!(condition.watch, Watch::Difference(_))
}

/// Lowest and highest temperature that an end drives towards, K; without bound where a flux does.
fn drives_to(end: &End) -> Option<(f64, f64)> {
    match end.outside {
        Outside::Given(flux) if flux > 0.0 => Some((f64::INFINITY, f64::INFINITY)),
        Outside::Given(flux) if flux < 0.0 => Some((f64::NEG_INFINITY, f64::NEG_INFINITY)),
        Outside::Given(_) | Outside::Held(_) | Outside::Exchange { .. } => end.outside.extent(),
    }
}

fn basis(draws: bool, later: bool) -> String {
    let surroundings = if later { "the last surroundings" } else { "the surroundings" };
    if draws {
        format!("{surroundings} as they stay; each layer's conductivity at its mean temperature")
    } else {
        "no heat passes the faces".to_owned()
    }
}
