//! How many cells each layer gets.

use crate::item::{Face, Item, Motion, Side, Start};
use crate::mesh::{Line, LineLayer, Mesh, line};

/// The mesh of an item with `most` cells across its slowest layer.
///
/// Faster layers get fewer, by the fourth root of their diffusion time `L² rho c / k`: a layer that follows
/// the others at once needs one cell only. Doubling the count of each halves every cell, so that two meshes
/// can be compared.
pub fn mesh(item: &Item, most: usize, halvings: u32) -> Mesh {
    let times: Vec<f64> = (0..item.layers().len()).map(|i| diffusion_time(item, i)).collect();
    let slowest = times.iter().fold(f64::MIN_POSITIVE, |most: f64, time| most.max(*time));
    let layers = item.layers().iter().zip(&times).map(|(layer, time)| {
        let share = (time / slowest).sqrt().sqrt();
        // At most 80 cells or so: the product is far from the limits of the type.
        #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
        let cells = (most as f64 * share).round().max(1.0) as usize;
        LineLayer {
            thickness: layer.thickness,
            mixed: layer.motion != Motion::Still,
            joint_resists: layer.contact > 0.0,
            cells: cells << halvings,
        }
    });
    let closed = |side: Side| item.face(side).rows.iter().all(|row| row.1 == Face::Insulated);
    line(&Line {
        shape: item.shape(),
        layers: layers.collect(),
        active: [!closed(Side::Inner), !closed(Side::Outer)],
    })
}

/// `L² rho c / k` of a layer, s; nothing for one that mixes itself.
fn diffusion_time(item: &Item, number: usize) -> f64 {
    let layer = &item.layers()[number];
    if layer.motion != Motion::Still {
        return 0.0;
    }
    let at = typical_temperature(item);
    layer.thickness * layer.thickness * layer.capacity.value(at) / layer.conductivity.value(at)
}

/// A temperature to take properties at where only their size matters, K.
fn typical_temperature(item: &Item) -> f64 {
    match item.start() {
        Start::Uniform(temperature) | Start::SteadyBefore { contents: Some(temperature), .. } => *temperature,
        Start::PerLayer(all) => all.iter().sum::<f64>() / all.len() as f64,
        Start::Profile(points) => points.iter().map(|point| point.1).sum::<f64>() / points.len() as f64,
        Start::SteadyBefore { inner, outer, .. } => {
            let (low, high) = [inner, outer]
                .iter()
                .filter_map(|face| extent(face))
                .fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), (from, to)| {
                    (low.min(from), high.max(to))
                });
            if low <= high { 0.5 * (low + high) } else { 300.0 }
        }
    }
}

/// Lowest and highest temperature that a face is drawn towards, K.
pub(super) fn extent(face: &Face) -> Option<(f64, f64)> {
    match face {
        Face::Insulated | Face::HeatFlux(_) => None,
        Face::Held(temperature) => Some(temperature.extent()),
        Face::Exchange { temperature, radiation_to, .. } => {
            let ((a, b), (c, d)) = (temperature.extent(), radiation_to.extent());
            Some((a.min(c), b.max(d)))
        }
    }
}

/// Highest minus lowest temperature that drives an item, K: start and surroundings.
pub(super) fn span(item: &Item, start: &[f64]) -> f64 {
    let rows = [Side::Inner, Side::Outer].into_iter().flat_map(|side| &item.face(side).rows);
    let seen = rows.filter_map(|row| extent(&row.1)).flat_map(|(low, high)| [low, high]);
    let all = start.iter().copied().chain(seen);
    let (low, high) =
        all.fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), t| (low.min(t), high.max(t)));
    high - low
}
