//! The steady state: Newton, led there by pseudo-time where it would not find its own way.

use super::balance::Balance;
use super::faces::FaceNow;
use super::linear::{Linear, Matrix};
use crate::item::{Face, OverTime};

/// Why no steady state came out.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum SteadyError {
    /// The changes stayed above the tolerance.
    NotFound {
        /// The last change, K.
        change: f64,
    },
}

impl std::fmt::Display for SteadyError {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        match self {
            Self::NotFound { change } => write!(f, "the last change was still {change} K"),
        }
    }
}

/// Pseudo-time steps at most; a linear item needs about ten.
const STEPS: usize = 200;
/// First pseudo-time step, s: short against any item, so that the first changes are small.
const FIRST_STEP: f64 = 1.0;
/// Each accepted step is this many times the one before.
const GROWTH: f64 = 8.0;
/// From here on it is Newton.
const ENDLESS: f64 = 1e18;
/// A change below this is rounding, K.
const SETTLED: f64 = 1e-9;

/// Temperatures at which nothing changes under `faces` as they are at time zero, K, one per node. Nodes that
/// `held` names keep their temperature.
///
/// # Errors
/// Where none is found: nothing fixes the temperature, or what comes in cannot leave.
pub fn steady<L: Linear + Default>(
    balance: &Balance<'_>,
    faces: [&Face; 2],
    held: &[Option<f64>],
) -> Result<Vec<f64>, SteadyError> {
    let seen = faces.map(|face| FaceNow::at(face, 0.0));
    let mut held = held.to_vec();
    for (face, seen) in balance.faces.iter().zip(&seen) {
        if let (Some(face), FaceNow::Held { temperature, .. }) = (face, seen) {
            held[face.node] = Some(*temperature);
        }
    }
    let first = first_guess(faces, &held);
    let mut temperatures: Vec<f64> = held.iter().map(|held| held.unwrap_or(first)).collect();
    let mut change = settle::<L>(balance, &seen, &held, &mut temperatures);
    if change > SETTLED * first.max(1.0) {
        change = f64::max(change, SETTLED);
        return Err(SteadyError::NotFound { change });
    }
    Ok(temperatures)
}

fn settle<L: Linear + Default>(
    balance: &Balance<'_>,
    seen: &[FaceNow; 2],
    held: &[Option<f64>],
    temperatures: &mut [f64],
) -> f64 {
    let (mut matrix, mut linear) = (Matrix::default(), L::default());
    let (mut flows, mut capacities) = (vec![0.0; temperatures.len()], Vec::new());
    let (mut step, mut last) = (FIRST_STEP, f64::INFINITY);
    for _ in 0..STEPS {
        balance.flows(temperatures, seen, &mut flows);
        balance.derivative(temperatures, seen, &mut matrix);
        balance.capacities(temperatures, &mut capacities);
        for (g, c) in matrix.diagonal.iter_mut().zip(&capacities) {
            *g += c / step;
        }
        for (node, _) in held.iter().enumerate().filter(|(_, held)| held.is_some()) {
            balance.fix(&mut matrix, node, balance.links_of(node));
            flows[node] = 0.0;
        }
        linear.factor(&matrix);
        linear.solve(&mut flows);
        let change = flows.iter().fold(0.0, |most: f64, change| most.max(change.abs()));
        if !change.is_finite() {
            return f64::INFINITY;
        }
        for (temperature, change) in temperatures.iter_mut().zip(&flows) {
            // A radiating face far from its end may ask for less than nothing; a tenth at a time is enough.
            *temperature = (*temperature + change).max(0.1 * *temperature);
        }
        let quiet = change <= SETTLED;
        if step >= ENDLESS && (quiet || (change < 1e-6 && change >= last)) {
            return if quiet { change } else { SETTLED };
        }
        step = (step * GROWTH).min(ENDLESS);
        last = change;
    }
    last
}

/// The mean of the temperatures that anything is drawn towards, K.
fn first_guess(faces: [&Face; 2], held: &[Option<f64>]) -> f64 {
    let at_zero = |over_time: &OverTime| over_time.at(0.0).0;
    let seen = faces.iter().filter_map(|face| match face {
        Face::Insulated | Face::HeatFlux(_) => None,
        Face::Held(temperature) | Face::Exchange { temperature, .. } => Some(at_zero(temperature)),
    });
    let all: Vec<f64> = held.iter().flatten().copied().chain(seen).collect();
    if all.is_empty() { 300.0 } else { all.iter().sum::<f64>() / all.len() as f64 }
}
