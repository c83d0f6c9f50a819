//! When the surroundings change: corners to stop at, the last change, and whether all repeats itself.

use crate::item::{Face, Item, OverTime, Side};

/// The times at which the surroundings do something.
#[derive(Clone, Debug)]
pub struct Calendar {
    /// After this nothing changes; infinite where it goes on for ever, s.
    last_change: f64,
    /// From here on all repeats with this period, s.
    round: Option<(f64, f64)>,
    /// Temperatures at the end of the last round, K.
    earlier: Vec<f64>,
}

impl Calendar {
    /// Looks through the programmes of both faces.
    pub fn new(item: &Item) -> Self {
        let mut last_change: f64 = 0.0;
        let mut periods = Vec::new();
        for side in [Side::Inner, Side::Outer] {
            let rows = &item.face(side).rows;
            for (i, (from, face)) in rows.iter().enumerate() {
                last_change = last_change.max(*from);
                if i + 1 < rows.len() {
                    continue;
                }
                for over_time in varying(face) {
                    match over_time {
                        OverTime::Constant(_) => {}
                        OverTime::Table(points) => last_change = last_change.max(points[points.len() - 1].0),
                        OverTime::Repeating { period, .. } | OverTime::Cycle { period, .. } => {
                            periods.push(*period);
                        }
                    }
                }
            }
        }
        let alike = periods.windows(2).all(|pair| pair[0] == pair[1]);
        let round = periods.first().filter(|_| alike).map(|&period| (last_change, period));
        if !periods.is_empty() {
            last_change = f64::INFINITY;
        }
        Self { last_change, round, earlier: Vec::new() }
    }

    /// After this nothing changes; infinite where it goes on for ever, s.
    pub fn last_change(&self) -> f64 {
        self.last_change
    }

    /// The next corner after `time`: a row that begins, a corner of a table, the end of a round; s.
    pub fn next(&self, item: &Item, time: f64) -> f64 {
        let mut next = f64::INFINITY;
        for side in [Side::Inner, Side::Outer] {
            let rows = &item.face(side).rows;
            let begun = rows.partition_point(|row| row.0 <= time);
            if let Some(row) = rows.get(begun) {
                next = next.min(row.0);
            }
            for over_time in varying(&rows[begun.max(1) - 1].1) {
                next = next.min(over_time.next_corner(time));
            }
        }
        if let Some((from, period)) = self.round {
            let rounds = ((time - from) / period + 1e-9).floor().max(-1.0) + 1.0;
            next = next.min(from + rounds * period);
        }
        next
    }

    /// At the end of a round: is everything as it was a round before, within `tolerance` K?
    pub fn repeats(&mut self, time: f64, temperatures: &[f64], tolerance: f64) -> bool {
        let Some((from, period)) = self.round else { return false };
        let rounds = (time - from) / period;
        if rounds < -1e-9 || (rounds - rounds.round()).abs() > 1e-9 {
            return false;
        }
        let alike = self.earlier.len() == temperatures.len()
            && self.earlier.iter().zip(temperatures).all(|(a, b)| (a - b).abs() < tolerance);
        self.earlier = temperatures.to_vec();
        alike
    }
}

/// What of a face may change over time.
fn varying(face: &Face) -> impl Iterator<Item = &OverTime> {
    let (first, second) = match face {
        Face::Insulated => (None, None),
        Face::Held(over_time) | Face::HeatFlux(over_time) => (Some(over_time), None),
        Face::Exchange { temperature, radiation_to, .. } => (Some(temperature), Some(radiation_to)),
    };
    first.into_iter().chain(second)
}
