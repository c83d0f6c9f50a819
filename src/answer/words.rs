//! The answer in words: the same in page, batch result and sheet.

use super::report::{Effort, HeatBalance};
use super::verdict::{Timed, Verdict};
use crate::item::{Condition, Sense, Watch};
use crate::units::clock::Clock;
use crate::units::{celsius, words};

/// Further ahead than this a weekday alone would mislead, s.
const WEEK: f64 = 6.0 * 86_400.0;

/// "Tuesday 14:20", further ahead with the date, without a clock "2 days 8 h after the stop".
pub fn when(time: f64, clock: Option<Clock>) -> String {
    match clock.and_then(|clock| clock.after(time)) {
        Some(then) if time < WEEK => then.weekday_time(),
        Some(then) => then.date_time(),
        None => format!("{} after the stop", words::duration(time)),
    }
}

/// "below 60 °C", "below 5 K", "slower than 1 K/h"
pub fn limit(condition: &Condition) -> String {
    let value = quantity(condition, condition.limit);
    match (condition.watch, condition.sense) {
        (Watch::Rate(_), Sense::Below) => format!("slower than {value}"),
        (Watch::Rate(_), Sense::Above) => format!("faster than {value}"),
        (_, Sense::Below) => format!("below {value}"),
        (_, Sense::Above) => format!("above {value}"),
    }
}

/// "hottest of the contents below 60 °C"
pub fn condition(condition: &Condition) -> String {
    format!("{} {}", condition.subject, limit(condition))
}

/// The watched quantity with its unit.
pub fn quantity(condition: &Condition, value: f64) -> String {
    match condition.watch {
        Watch::Rate(_) => format!("{} K/h", short(value * SECONDS_PER_HOUR)),
        Watch::Difference(_) => format!("{} K", short(value)),
        Watch::Hottest(_) | Watch::Coldest(_) | Watch::Mean(_) | Watch::Place(_) | Watch::Face(_) => {
            words::temperature(value)
        }
    }
}

/// The watched quantity as a number in the unit of the limit: °C, K or K/h.
pub fn in_unit_of_the_limit(condition: &Condition, value: f64) -> f64 {
    match condition.watch {
        Watch::Rate(_) => value * SECONDS_PER_HOUR,
        Watch::Difference(_) => value,
        Watch::Hottest(_) | Watch::Coldest(_) | Watch::Mean(_) | Watch::Place(_) | Watch::Face(_) => {
            celsius(value)
        }
    }
}

const SECONDS_PER_HOUR: f64 = 3_600.0;

/// Three significant digits, without needless zeros.
fn short(value: f64) -> String {
    let size = value.abs();
    let text = if size >= 100.0 {
        format!("{value:.0}")
    } else if size >= 10.0 {
        format!("{value:.1}")
    } else if size >= 1.0 {
        format!("{value:.2}")
    } else {
        format!("{value:.3}")
    };
    if text.contains('.') { text.trim_end_matches('0').trim_end_matches('.').to_owned() } else { text }
}

/// What became of one condition: "Tuesday 14:20", "from the start", "never: it settles at 63.2 °C".
pub fn outcome(
    verdict: &Verdict,
    of: &Condition,
    nearest: f64,
    repeats: bool,
    look_ahead: f64,
    clock: Option<Clock>,
) -> String {
    match verdict {
        Verdict::Already { lost, for_good } => {
            format!("from the start{}", coming_and_going(*lost, *for_good, clock))
        }
        Verdict::At { moment, lost, for_good } => {
            format!("{}{}", when(moment.time, clock), coming_and_going(*lost, *for_good, clock))
        }
        Verdict::Never if repeats => format!("never: it comes no nearer than {}", quantity(of, nearest)),
        Verdict::Never => format!("never: it settles at {}", quantity(of, nearest)),
        Verdict::NotWithin => {
            format!("not within {}: then it is at {}", words::duration(look_ahead), quantity(of, nearest))
        }
    }
}

/// ", lost again Tuesday 18:00, for good from Wednesday 02:00"
pub fn coming_and_going(lost: Option<Timed>, for_good: Option<Timed>, clock: Option<Clock>) -> String {
    let lost = lost.map_or_else(String::new, |lost| format!(", lost again {}", when(lost.time, clock)));
    let good =
        for_good.map_or_else(String::new, |good| format!(", for good from {}", when(good.time, clock)));
    lost + &good
}

/// Headline and second line for what it is ready for.
pub fn ready(
    verdict: &Verdict,
    conditions: &[Condition],
    nearest: &[f64],
    look_ahead: f64,
    clock: Option<Clock>,
) -> (String, String) {
    match verdict {
        Verdict::At { moment, lost, for_good } => {
            let after = words::duration(moment.time);
            let band = words::duration(0.5 * (moment.high - moment.low));
            let stays = if lost.is_none() { "; it stays so" } else { "" };
            let comes = coming_and_going(*lost, *for_good, clock);
            let detail = if clock.is_some() {
                format!("{after} after the stop, calculated to ± {band}{comes}{stays}.")
            } else {
                format!("Calculated to ± {band}{comes}{stays}.")
            };
            (format!("Ready {}", when(moment.time, clock)), detail)
        }
        Verdict::Already { lost, for_good } => {
            let comes = coming_and_going(*lost, *for_good, clock);
            let detail = if lost.is_none() {
                "All that was asked holds at the stop and stays so.".to_owned()
            } else {
                format!("All that was asked holds at the stop{comes}.")
            };
            ("Ready from the start".to_owned(), detail)
        }
        Verdict::Never => never(conditions, nearest),
        Verdict::NotWithin => (
            format!("Not ready within {}", words::duration(look_ahead)),
            "It may come later: look further ahead, or see the conditions below.".to_owned(),
        ),
    }
}

fn never(conditions: &[Condition], nearest: &[f64]) -> (String, String) {
    let holds = |condition: &Condition, value: f64| match condition.sense {
        Sense::Below => value < condition.limit,
        Sense::Above => value > condition.limit,
    };
    let missed: Vec<(&Condition, f64)> =
        conditions.iter().zip(nearest.iter().copied()).filter(|(c, value)| !holds(c, *value)).collect();
    let ends: Vec<String> =
        missed.iter().map(|(c, value)| format!("{} settles at {}", c.subject, quantity(c, *value))).collect();
    let headline = match missed.as_slice() {
        [(only, _)] => format!("Never {}", limit(only)),
        _ => "Never ready".to_owned(),
    };
    let detail = if ends.is_empty() {
        "Each condition is reached, but never all at once.".to_owned()
    } else {
        format!("{}.", capital(&ends.join("; ")))
    };
    (headline, detail)
}

/// Headline and second line for how long it may stand.
pub fn standing(
    verdict: &Verdict,
    first: Option<&Condition>,
    look_ahead: f64,
    clock: Option<Clock>,
) -> (String, String) {
    let what = first.map_or_else(String::new, |first| format!(": then {}", condition(first)));
    match verdict {
        Verdict::At { moment, .. } => {
            let band = words::duration(0.5 * (moment.high - moment.low));
            let after = words::duration(moment.time);
            (
                format!("May stand until {}", when(moment.time, clock)),
                format!("{after} after the stop, calculated to ± {band}{what}."),
            )
        }
        Verdict::Already { .. } => (
            "Past its limit from the start".to_owned(),
            capital(&format!("{}.", what.trim_start_matches(": then "))),
        ),
        Verdict::Never => {
            ("No limit is reached".to_owned(), "All settles before any limit is crossed.".to_owned())
        }
        Verdict::NotWithin => (
            format!("No limit is reached within {}", words::duration(look_ahead)),
            "What comes later was not looked at.".to_owned(),
        ),
    }
}

/// How far to trust the calculation, as (what, how much).
pub fn checks(
    decisive: Option<Timed>,
    balance: &HeatBalance,
    effort: &Effort,
    clock: Option<Clock>,
) -> Vec<(&'static str, String)> {
    let mut all = Vec::new();
    if let Some(moment) = decisive {
        let half = words::duration(0.5 * (moment.high - moment.low));
        let mut text = format!("{} ± {half}", when(moment.time, clock));
        if moment.time > 0.0 {
            let share = short(50.0 * (moment.high - moment.low) / moment.time);
            text = format!("{text} ({share} %)");
        }
        all.push(("Error of the calculation itself", text));
    }
    let heat = |joule: f64| format!("{} MJ", short(joule * 1e-6));
    let faces = balance.in_inner_j + balance.in_outer_j;
    let (stored, passed) = if faces <= 0.0 {
        ("given off", "left through the faces")
    } else {
        ("taken up", "came in through the faces")
    };
    let text = format!(
        "{} {stored} and {} {passed} {} until {}: they agree to {:.0e}",
        heat(balance.stored_j.abs()),
        heat(faces.abs()),
        balance.per,
        when(balance.until_s, clock),
        balance.relative_error.max(1e-16)
    );
    all.push(("Heat balance", text));
    let text = format!(
        "{} and {} places, {} steps of order 4, tolerance {} and {} K, extrapolated",
        effort.nodes[0],
        effort.nodes[1],
        effort.steps,
        short(effort.tolerance_k[0]),
        short(effort.tolerance_k[1])
    );
    all.push(("Calculated on", text));
    all
}

/// With a capital first letter.
pub fn capital(text: &str) -> String {
    let mut letters = text.chars();
    letters.next().map_or_else(String::new, |first| first.to_uppercase().chain(letters).collect())
}
