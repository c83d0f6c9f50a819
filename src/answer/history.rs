//! The march, remembered: temperatures of every node at any time of it.

use super::gauge::Gauge;
use crate::item::Watch;
use crate::mesh::Mesh;

/// Temperatures over time, dense: order 3 within each step (the dense output of the time step).
#[derive(Clone, Debug, PartialEq)]
pub struct History {
    mesh: Mesh,
    times: Vec<f64>,
    /// One row of node temperatures per time, K.
    rows: Vec<f64>,
    /// Per step the two vectors of its dense output, K.
    bends: Vec<f64>,
}

impl History {
    pub(super) fn new(mesh: Mesh, start: &[f64]) -> Self {
        Self { mesh, times: vec![0.0], rows: start.to_vec(), bends: Vec::new() }
    }

    /// What stands at time zero once the surroundings have begun: a held face has its temperature at once.
    pub(super) fn restart(&mut self, temperatures: &[f64]) {
        self.rows.clear();
        self.rows.extend_from_slice(temperatures);
    }

    /// A step that ended at `time`.
    pub(super) fn add(&mut self, time: f64, temperatures: &[f64], first: &[f64], second: &[f64]) {
        self.times.push(time);
        self.rows.extend_from_slice(temperatures);
        self.bends.extend_from_slice(first);
        self.bends.extend_from_slice(second);
    }

    /// The mesh it was computed on.
    pub fn mesh(&self) -> &Mesh {
        &self.mesh
    }

    /// Place of each node: distance from the inside, m, ascending; a joint that resists stands twice.
    pub fn places(&self) -> &[f64] {
        &self.mesh.places
    }

    /// Times of the steps, s, from 0 on.
    pub fn times(&self) -> &[f64] {
        &self.times
    }

    /// Where it ends, s.
    pub fn end(&self) -> f64 {
        self.times[self.times.len() - 1]
    }

    /// Temperature of every node at a time, K; held at its ends outside.
    pub fn temperatures(&self, time: f64) -> Vec<f64> {
        let nodes = self.mesh.nodes();
        let row = |i: usize| &self.rows[i * nodes..(i + 1) * nodes];
        let after = self.times.partition_point(|&at| at <= time);
        if after == 0 {
            return row(0).to_vec();
        }
        if after == self.times.len() {
            return row(after - 1).to_vec();
        }
        let (from, to) = (self.times[after - 1], self.times[after]);
        let bend = &self.bends[(after - 1) * 2 * nodes..after * 2 * nodes];
        let mut out = Vec::new();
        interpolate(row(after - 1), row(after), bend, (time - from) / (to - from), &mut out);
        out
    }

    /// Watched temperatures at some times, K: one row per watch, one entry per time.
    pub fn courses(&self, watches: &[Watch], times: &[f64]) -> Vec<Vec<f64>> {
        let gauges: Vec<Gauge> = watches.iter().map(|watch| Gauge::new(*watch, &self.mesh)).collect();
        let mut rows = vec![Vec::with_capacity(times.len()); watches.len()];
        for &time in times {
            let temperatures = self.temperatures(time);
            let rates = if gauges.iter().any(Gauge::needs_rates) { self.rates(time) } else { Vec::new() };
            for (row, gauge) in rows.iter_mut().zip(&gauges) {
                row.push(gauge.value(&self.mesh.places, &temperatures, &rates));
            }
        }
        rows
    }

    /// A watched quantity at a time, K (a rate: K/s).
    pub fn watch(&self, watch: &Watch, time: f64) -> f64 {
        let gauge = Gauge::new(*watch, &self.mesh);
        let rates = if gauge.needs_rates() { self.rates(time) } else { Vec::new() };
        gauge.value(&self.mesh.places, &self.temperatures(time), &rates)
    }

    /// Rates of change at a time, K/s, by a small difference within the step.
    fn rates(&self, time: f64) -> Vec<f64> {
        let after = self.times.partition_point(|&at| at <= time).clamp(1, self.times.len() - 1);
        let small = 1e-4 * (self.times[after] - self.times[after - 1]);
        let middle = time.clamp(self.times[after - 1] + small, self.times[after] - small);
        let (before, behind) = (self.temperatures(middle - small), self.temperatures(middle + small));
        before.iter().zip(&behind).map(|(a, b)| (b - a) / (2.0 * small)).collect()
    }
}

/// Temperatures at `s` from 0 to 1 within a step, from its ends and the two vectors of its dense output.
pub(super) fn interpolate(from: &[f64], to: &[f64], bend: &[f64], s: f64, out: &mut Vec<f64>) {
    let (first, second) = bend.split_at(from.len());
    let ends = from.iter().zip(to).zip(first.iter().zip(second));
    out.clear();
    out.extend(ends.map(|((a, b), (u, v))| (1.0 - s) * a + s * (b + (1.0 - s) * (u + s * v))));
}
