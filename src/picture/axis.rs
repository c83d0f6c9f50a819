//! Axes: which values get a tick, and how ticks and labels find room.

use crate::units::clock::Clock;

/// Even values from `low` to `high`, about `count` of them, in steps of 1, 2 or 5.
pub fn ticks(low: f64, high: f64, count: usize) -> Vec<f64> {
    let rough = (high - low) / count.max(1) as f64;
    if !(rough > 0.0 && rough.is_finite()) {
        return vec![low];
    }
    let power = libm::pow(10.0, libm::floor(libm::log10(rough)));
    let step = [1.0, 2.0, 5.0, 10.0].iter().map(|m| m * power).find(|step| *step >= rough).unwrap_or(rough);
    let first = (low / step - 1e-9).ceil();
    (0..200).map(|i| (first + f64::from(i)) * step).take_while(|value| *value <= high + 1e-9 * step).collect()
}

/// A number as its tick shows it, with as many digits as the step needs.
pub fn number(value: f64, step: f64) -> String {
    let digits = if step >= 1.0 {
        0
    } else if step >= 0.1 {
        1
    } else if step >= 0.01 {
        2
    } else {
        3
    };
    let text = format!("{value:.digits$}");
    if text.trim_start_matches('-').chars().all(|c| c == '0' || c == '.') {
        text.trim_start_matches('-').to_owned()
    } else {
        text.replace('-', "−")
    }
}

const MINUTE: f64 = 60.0;
const HOUR: f64 = 3_600.0;
const DAY: f64 = 86_400.0;
/// Steps in which people read a clock or a calendar, s.
const STEPS: [f64; 24] = [
    1.0,
    2.0,
    5.0,
    10.0,
    30.0,
    MINUTE,
    2.0 * MINUTE,
    5.0 * MINUTE,
    10.0 * MINUTE,
    30.0 * MINUTE,
    HOUR,
    2.0 * HOUR,
    3.0 * HOUR,
    6.0 * HOUR,
    12.0 * HOUR,
    DAY,
    2.0 * DAY,
    5.0 * DAY,
    10.0 * DAY,
    30.0 * DAY,
    90.0 * DAY,
    365.0 * DAY,
    1_825.0 * DAY,
    3_650.0 * DAY,
];

/// Times of ticks from 0 to `end`, about `count` of them, each with its label.
pub fn time_ticks(end: f64, count: usize, clock: Option<Clock>) -> Vec<(f64, String)> {
    let rough = end / count.max(1) as f64;
    let step = STEPS.iter().copied().find(|step| *step >= rough).unwrap_or(rough);
    // On a clock whole hours and midnights are marked, not whole hours after the stop.
    let offset = clock.filter(|_| step >= MINUTE).map_or(0.0, |clock| clock.since_midnight() % step.min(DAY));
    let first = if offset > 0.0 { step.min(DAY) - offset } else { 0.0 };
    let times = (0..200).map(|i| first + f64::from(i) * step).take_while(|time| *time <= end * (1.0 + 1e-9));
    times.map(|time| (time, time_label(time, step, clock))).collect()
}

fn time_label(time: f64, step: f64, clock: Option<Clock>) -> String {
    match clock.and_then(|clock| clock.after(time)) {
        Some(then) if step >= DAY => then.day(),
        Some(then) if step >= MINUTE => then.short(),
        _ if step >= DAY => format!("{} d", number(time / DAY, 1.0)),
        _ if step >= HOUR => format!("{} h", number(time / HOUR, 1.0)),
        _ if step >= MINUTE => format!("{} min", number(time / MINUTE, 1.0)),
        _ => format!("{} s", number(time, 1.0)),
    }
}

/// Moves places on a line apart until each is `gap` from the next, within `low` to `high`, in the order given.
pub fn spread(wanted: &[f64], gap: f64, low: f64, high: f64) -> Vec<f64> {
    let mut order: Vec<usize> = (0..wanted.len()).collect();
    order.sort_by(|&a, &b| wanted[a].total_cmp(&wanted[b]));
    let mut places = wanted.to_vec();
    let mut edge = low;
    for &i in &order {
        places[i] = places[i].max(edge);
        edge = places[i] + gap;
    }
    let mut edge = high;
    for &i in order.iter().rev() {
        places[i] = places[i].min(edge);
        edge = places[i] - gap;
    }
    places
}
