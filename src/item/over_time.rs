//! A quantity over time: constant, ramp, table, cycle.

use std::f64::consts::TAU;

/// A quantity over time, SI; time in s after the stop.
#[derive(Clone, Debug, PartialEq)]
pub enum OverTime {
    /// The same all the time.
    Constant(f64),
    /// Straight lines between points, the end values outside; ascending times, at least two.
    Table(Vec<(f64, f64)>),
    /// A table that starts again each period; the period is not shorter than the table.
    Repeating {
        /// Ascending times, at least two.
        points: Vec<(f64, f64)>,
        /// s
        period: f64,
    },
    /// `mean + amplitude cos(2 pi (t - highest_at) / period)`
    Cycle {
        /// Mean value.
        mean: f64,
        /// Half of highest minus lowest.
        amplitude: f64,
        /// s
        period: f64,
        /// s
        highest_at: f64,
    },
}

impl OverTime {
    /// The value and its derivative per second at time `t`; at a corner those of the piece that begins there.
    pub fn at(&self, t: f64) -> (f64, f64) {
        match self {
            Self::Constant(value) => (*value, 0.0),
            Self::Table(points) => on_lines(points, t),
            Self::Repeating { points, period } => repeating(points, *period, t),
            Self::Cycle { mean, amplitude, period, highest_at } => {
                let phase = TAU * (t - highest_at) / period;
                (mean + amplitude * libm::cos(phase), -amplitude * TAU / period * libm::sin(phase))
            }
        }
    }

    /// The first corner later than `t`, s; infinite where there is none.
    pub fn next_corner(&self, t: f64) -> f64 {
        match self {
            Self::Constant(_) | Self::Cycle { .. } => f64::INFINITY,
            Self::Table(points) => {
                points.iter().map(|point| point.0).find(|&at| at > t).unwrap_or(f64::INFINITY)
            }
            Self::Repeating { points, period } => {
                let round = ((t - points[0].0) / period).floor();
                let shifted = |rounds: f64| points.iter().map(move |point| point.0 + rounds * period);
                shifted(round).chain(shifted(round + 1.0)).find(|&at| at > t).unwrap_or(f64::INFINITY)
            }
        }
    }

    /// Does it go on changing for ever?
    pub fn is_periodic(&self) -> bool {
        match self {
            Self::Constant(_) | Self::Table(_) => false,
            Self::Repeating { .. } => true,
            Self::Cycle { amplitude, .. } => *amplitude != 0.0,
        }
    }

    /// Lowest and highest value it ever has.
    pub fn extent(&self) -> (f64, f64) {
        match self {
            Self::Constant(value) => (*value, *value),
            Self::Table(points) | Self::Repeating { points, .. } => points
                .iter()
                .fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), p| (low.min(p.1), high.max(p.1))),
            Self::Cycle { mean, amplitude, .. } => (mean - amplitude.abs(), mean + amplitude.abs()),
        }
    }
}

/// Value and slope on the straight lines through the points; flat outside.
fn on_lines(points: &[(f64, f64)], t: f64) -> (f64, f64) {
    let after = points.partition_point(|point| point.0 <= t);
    if after == 0 {
        return (points[0].1, 0.0);
    }
    let (t0, v0) = points[after - 1];
    let Some(&(t1, v1)) = points.get(after) else { return (v0, 0.0) };
    let slope = (v1 - v0) / (t1 - t0);
    (v0 + slope * (t - t0), slope)
}

/// The same, repeated; between the last point and the next round a straight line closes it.
fn repeating(points: &[(f64, f64)], period: f64, t: f64) -> (f64, f64) {
    let (first_at, first_value) = points[0];
    let within = first_at + (t - first_at).rem_euclid(period);
    let (last_at, last_value) = points[points.len() - 1];
    if within < last_at {
        return on_lines(points, within);
    }
    let gap = first_at + period - last_at;
    if gap <= 0.0 {
        return on_lines(points, first_at);
    }
    let slope = (first_value - last_value) / gap;
    (last_value + slope * (within - last_at), slope)
}
