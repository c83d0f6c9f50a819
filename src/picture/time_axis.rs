//! The axis of time: clock times and days where the stop has a date, else time since the stop.

use super::number::{Ticks, fixed};
use crate::units::clock::Clock;

const MINUTE: f64 = 60.0;
const HOUR: f64 = 3_600.0;
const DAY: f64 = 86_400.0;
/// Mean Gregorian year, 365.2425 days.
const YEAR: f64 = 365.2425 * DAY;

/// Below this the clock, which shows minutes, is too coarse, s.
const SHORT: f64 = 10.0 * MINUTE;

/// Distances of clock ticks within a day, s.
const IN_A_DAY: [f64; 12] = [
    MINUTE,
    2.0 * MINUTE,
    5.0 * MINUTE,
    10.0 * MINUTE,
    15.0 * MINUTE,
    30.0 * MINUTE,
    HOUR,
    2.0 * HOUR,
    3.0 * HOUR,
    4.0 * HOUR,
    6.0 * HOUR,
    12.0 * HOUR,
];

/// Least gap between two labels of one row, px.
const GAP: f64 = 14.0;

/// What stands along the axis of time.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct TimeAxis {
    /// (s; label, empty for a tick alone), ascending.
    pub ticks: Vec<(f64, String)>,
    /// (from, s; to, s; label): days, each between two midnights.
    pub days: Vec<(f64, f64, String)>,
    /// Do the days stand in the row of the tick labels?
    pub days_alone: bool,
    /// What is counted, where it is not the clock.
    pub title: String,
}

impl TimeAxis {
    /// Does anything stand below the labels of the ticks?
    pub fn has_two_rows(&self) -> bool {
        !self.title.is_empty() || (!self.days.is_empty() && !self.days_alone)
    }
}

/// Where the axis goes and how wide its labels are.
pub struct Room<'a> {
    /// Begin, s.
    pub from: f64,
    /// End, s.
    pub to: f64,
    /// Length of the axis, px.
    pub px: f64,
    /// Width of a label, px.
    pub width_of: &'a dyn Fn(&str) -> f64,
}

impl Room<'_> {
    fn px_of(&self, seconds: f64) -> f64 {
        seconds / (self.to - self.from) * self.px
    }

    /// Have labels like this room at such a distance?
    fn takes(&self, label: &str, step: f64) -> bool {
        (self.width_of)(label) + GAP <= self.px_of(step)
    }
}

/// The axis over a time that begins at `stop`.
pub fn time_axis(room: &Room, stop: Option<Clock>) -> TimeAxis {
    let span = room.to - room.from;
    match stop.filter(|_| span >= SHORT) {
        Some(stop) => by_the_clock(room, stop).unwrap_or_else(|| since_the_stop(room)),
        None => since_the_stop(room),
    }
}

/// None beyond the calendar.
fn by_the_clock(room: &Room, stop: Clock) -> Option<TimeAxis> {
    stop.after(room.to)?;
    let within = IN_A_DAY.into_iter().find(|step| room.takes("00:00", *step));
    if let Some(step) = within {
        let at = ticks_from_midnight(room, stop, step);
        let label = |t: f64| stop.after(t).map_or_else(String::new, Clock::hour_minute);
        let ticks = at.into_iter().map(|t| (t, label(t))).collect();
        return Some(TimeAxis { ticks, days: days(room, stop), ..TimeAxis::default() });
    }
    if room.takes("Wed", DAY) {
        let ticks = ticks_from_midnight(room, stop, DAY).into_iter().map(|t| (t, String::new())).collect();
        return Some(TimeAxis { ticks, days: days(room, stop), days_alone: true, ..TimeAxis::default() });
    }
    let mut step = 2.0 * DAY;
    while !room.takes("30 Nov", step) {
        step = if step < 7.0 * DAY { 7.0 * DAY } else { 2.0 * step };
    }
    let label = |t: f64| stop.after(t).map_or_else(String::new, Clock::day);
    let ticks = ticks_from_midnight(room, stop, step).into_iter().map(|t| (t, label(t))).collect();
    Some(TimeAxis { ticks, ..TimeAxis::default() })
}

/// Multiples of a step, counted from the midnight before the stop.
fn ticks_from_midnight(room: &Room, stop: Clock, step: f64) -> Vec<f64> {
    let midnight = -stop.since_midnight();
    let mut count = ((room.from - midnight) / step - 1e-9).ceil();
    let mut ticks = Vec::new();
    loop {
        let tick = midnight + count * step;
        if tick > room.to + 1e-6 * step {
            return ticks;
        }
        ticks.push(tick);
        count += 1.0;
    }
}

/// The days, named as fully as the narrower of the whole ones allows.
fn days(room: &Room, stop: Clock) -> Vec<(f64, f64, String)> {
    let mut bounds = vec![room.from];
    bounds
        .extend(ticks_from_midnight(room, stop, DAY).into_iter().filter(|t| *t > room.from && *t < room.to));
    bounds.push(room.to);
    let name = |from: f64, to: f64| {
        let Some(clock) = stop.after(0.5 * (from + to)) else { return String::new() };
        let weekday = &clock.short()[..3];
        let names = [format!("{weekday} {}", clock.day()), weekday.to_owned()];
        names.into_iter().find(|name| room.takes(name, to - from)).unwrap_or_default()
    };
    bounds.windows(2).map(|pair| (pair[0], pair[1], name(pair[0], pair[1]))).collect()
}

fn since_the_stop(room: &Room) -> TimeAxis {
    let (unit, name, steps): (f64, &str, &[f64]) = match room.to - room.from {
        span if span <= 3.0 * MINUTE => (1.0, "seconds", &[1.0, 2.0, 5.0, 10.0, 15.0, 30.0, 60.0]),
        span if span <= 3.0 * HOUR => (MINUTE, "minutes", &[0.5, 1.0, 2.0, 5.0, 10.0, 15.0, 30.0, 60.0]),
        span if span <= 5.0 * DAY => (HOUR, "hours", &[0.5, 1.0, 2.0, 3.0, 6.0, 12.0, 24.0, 48.0]),
        span if span <= 3.0 * YEAR => (DAY, "days", &[1.0, 2.0, 5.0, 10.0, 20.0, 50.0, 100.0, 200.0]),
        _ => (YEAR, "years", &[]),
    };
    let (from, to) = (room.from / unit, room.to / unit);
    let ticks = match steps.iter().find(|step| room.takes(&widest(from, to, **step), **step * unit)) {
        Some(&step) => multiples(from, to, step),
        None => round(room, from, to, unit),
    };
    TimeAxis {
        ticks: ticks.into_iter().map(|(at, label)| (at * unit, label)).collect(),
        title: format!("{name} since the stop"),
        ..TimeAxis::default()
    }
}

/// The longest label there can be.
fn widest(from: f64, to: f64, step: f64) -> String {
    fixed(if from.abs() > to.abs() { from } else { to }, usize::from(step < 1.0))
}

fn multiples(from: f64, to: f64, step: f64) -> Vec<(f64, String)> {
    let ticks = Ticks::multiples(from, to, step, usize::from(step < 1.0));
    ticks.at.iter().map(|at| (*at, ticks.label(*at))).collect()
}

/// Steps of 1, 2, 5 times a power of ten.
fn round(room: &Room, from: f64, to: f64, unit: f64) -> Vec<(f64, String)> {
    let mut most = 12;
    loop {
        let ticks = Ticks::round(from, to, most);
        let fits = ticks.at.iter().all(|at| room.takes(&ticks.label(*at), ticks.step * unit));
        if fits || most == 2 {
            return ticks.at.iter().map(|at| (*at, ticks.label(*at))).collect();
        }
        most -= 1;
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn axis(hours: f64, px: f64, stop: Option<&str>) -> TimeAxis {
        let room =
            Room { from: 0.0, to: hours * HOUR, px, width_of: &|text| 8.0 * text.chars().count() as f64 };
        time_axis(&room, stop.and_then(Clock::parse))
    }

    fn labels(axis: &TimeAxis) -> Vec<&str> {
        axis.ticks.iter().map(|(_, label)| label.as_str()).collect()
    }

    fn day_names(axis: &TimeAxis) -> Vec<&str> {
        axis.days.iter().map(|(_, _, name)| name.as_str()).collect()
    }

    #[test]
    fn a_weekend_carries_clock_times_over_days() {
        let wide = axis(72.0, 640.0, Some("2026-03-01T06:10"));
        assert_eq!(labels(&wide), ["12:00", "00:00", "12:00", "00:00", "12:00", "00:00"]);
        assert_eq!(day_names(&wide), ["Sun 1 Mar", "Mon 2 Mar", "Tue 3 Mar", "Wed"]);
        let narrow = axis(72.0, 200.0, Some("2026-03-01T06:10"));
        assert_eq!(labels(&narrow), ["", "", ""]);
        assert!(narrow.days_alone);
        assert_eq!(day_names(&narrow), ["Sun", "Mon", "Tue", ""]);
    }

    #[test]
    fn a_shift_is_cut_at_whole_hours() {
        let shift = axis(8.0, 440.0, Some("2026-03-01T22:25"));
        assert_eq!(labels(&shift), ["23:00", "00:00", "01:00", "02:00", "03:00", "04:00", "05:00", "06:00"]);
        assert_eq!(day_names(&shift), ["Sun 1 Mar", "Mon 2 Mar"]);
    }

    #[test]
    fn months_carry_dates() {
        let season = axis(90.0 * 24.0, 500.0, Some("2026-03-01T06:00"));
        assert_eq!(labels(&season), ["15 Mar", "29 Mar", "12 Apr", "26 Apr", "10 May", "24 May"]);
    }

    #[test]
    fn without_a_date_time_is_counted_from_the_stop() {
        assert_eq!(labels(&axis(72.0, 300.0, None)), ["0", "12", "24", "36", "48", "60", "72"]);
        assert_eq!(axis(72.0, 300.0, None).title, "hours since the stop");
        assert_eq!(labels(&axis(0.02, 300.0, None)), ["0", "10", "20", "30", "40", "50", "60", "70"]);
        assert_eq!(axis(0.02, 300.0, Some("2026-03-01T06:00")).title, "seconds since the stop");
        assert_eq!(labels(&axis(1e6, 300.0, None)).first(), Some(&"0"));
        assert_eq!(axis(1e6, 300.0, None).title, "years since the stop");
    }

    #[test]
    fn labels_keep_their_distance_at_any_length_of_time() {
        for stop in [None, Some("2026-03-01T06:10")] {
            let mut hours = 0.001;
            while hours < 1e5 {
                for px in [150.0, 320.0, 800.0] {
                    let axis = axis(hours, px, stop);
                    let scale = px / (hours * HOUR);
                    for pair in axis.ticks.windows(2) {
                        let apart = (pair[1].0 - pair[0].0) * scale;
                        let half = |label: &str| 4.0 * label.chars().count() as f64;
                        assert!(apart >= half(&pair[0].1) + half(&pair[1].1), "{hours} h, {px} px");
                    }
                    assert!(axis.ticks.len() <= 60);
                }
                hours *= 1.37;
            }
        }
    }
}
