//! The temperatures at time zero.

use super::balance::Balance;
use super::linear::Tridiagonal;
use super::steady::{SteadyError, steady};
use crate::item::{Face, Item, Start};
use crate::mesh::Mesh;

/// Temperature of every node at time zero, K.
///
/// # Errors
/// Where the start is an earlier steady state that cannot be found.
pub fn start_temperatures(item: &Item, mesh: &Mesh, balance: &Balance<'_>) -> Result<Vec<f64>, SteadyError> {
    match item.start() {
        Start::Uniform(temperature) => Ok(vec![*temperature; mesh.nodes()]),
        Start::PerLayer(temperatures) => Ok(per_layer(mesh, balance, temperatures)),
        Start::Profile(points) => Ok(mesh.places.iter().map(|place| on_profile(points, *place)).collect()),
        Start::SteadyBefore { contents, inner, outer } => {
            let mut held = vec![None; mesh.nodes()];
            if let Some(temperature) = contents {
                let (first, last) = mesh.layers[0];
                held[first..=last].fill(Some(*temperature));
            }
            let faces: [&Face; 2] = [inner, outer];
            steady::<Tridiagonal>(balance, faces, &held)
        }
    }
}

/// A node that two layers share gets the temperature at which it stores the heat of its two halves.
fn per_layer(mesh: &Mesh, balance: &Balance<'_>, temperatures: &[f64]) -> Vec<f64> {
    let mut all = vec![temperatures[0]; mesh.nodes()];
    for (&(first, last), temperature) in mesh.layers.iter().zip(temperatures) {
        all[first..=last].fill(*temperature);
    }
    for number in 1..mesh.layers.len() {
        let shared = mesh.layers[number].0;
        if mesh.layers[number - 1].1 == shared {
            all[shared] = balance.mixed_temperature(mesh, shared, temperatures);
        }
    }
    all
}

fn on_profile(points: &[(f64, f64)], place: f64) -> f64 {
    let after = points.partition_point(|point| point.0 <= place);
    if after == 0 {
        return points[0].1;
    }
    let (x0, t0) = points[after - 1];
    points.get(after).map_or(t0, |&(x1, t1)| t0 + (t1 - t0) * (place - x0) / (x1 - x0))
}
