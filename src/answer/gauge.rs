//! What a condition watches, read off the nodes of a mesh.

use crate::item::{Region, Side, Watch};
use crate::mesh::Mesh;

/// A watched quantity on one mesh.
#[derive(Clone, Debug, PartialEq)]
pub enum Gauge {
    /// A weighted sum of node temperatures: mean, place, face.
    Weighted(Vec<(usize, f64)>),
    /// The hottest place of some layers, each as (first, last node).
    Hottest(Vec<(usize, usize)>),
    /// The coldest place.
    Coldest(Vec<(usize, usize)>),
    /// Hottest minus coldest.
    Difference(Vec<(usize, usize)>),
    /// The size of the rate of change of a weighted sum.
    Rate(Vec<(usize, f64)>),
}

/// Up to three nodes with their weights.
type Weights = [(usize, f64); 3];

impl Gauge {
    /// The gauge of a watch on a mesh.
    pub fn new(watch: Watch, mesh: &Mesh) -> Self {
        match watch {
            Watch::Hottest(region) => Self::Hottest(segments(region, mesh)),
            Watch::Coldest(region) => Self::Coldest(segments(region, mesh)),
            Watch::Difference(region) => Self::Difference(segments(region, mesh)),
            Watch::Mean(region) => Self::Weighted(volume_weights(region, mesh)),
            Watch::Rate(region) => Self::Rate(volume_weights(region, mesh)),
            Watch::Place(place) => Self::Weighted(place_weights(place, mesh)),
            Watch::Face(Side::Inner) => Self::Weighted(vec![(0, 1.0)]),
            Watch::Face(Side::Outer) => Self::Weighted(vec![(mesh.nodes() - 1, 1.0)]),
        }
    }

    /// Does it need rates of change to be read?
    pub fn needs_rates(&self) -> bool {
        matches!(self, Self::Rate(_))
    }

    /// The quantity: K, or K/s for a rate. `rates` are those of the nodes, K/s; read by a rate only.
    pub fn value(&self, places: &[f64], temperatures: &[f64], rates: &[f64]) -> f64 {
        let sum = |weights: &[(usize, f64)], of: &[f64]| weights.iter().map(|&(i, w)| w * of[i]).sum::<f64>();
        match self {
            Self::Weighted(weights) => sum(weights, temperatures),
            Self::Rate(weights) => sum(weights, rates).abs(),
            Self::Hottest(all) => sum(&extreme(all, places, temperatures, 1.0), temperatures),
            Self::Coldest(all) => sum(&extreme(all, places, temperatures, -1.0), temperatures),
            Self::Difference(all) => {
                sum(&extreme(all, places, temperatures, 1.0), temperatures)
                    - sum(&extreme(all, places, temperatures, -1.0), temperatures)
            }
        }
    }

    /// Its own rate of change, K/s; none for a rate.
    pub fn slope(&self, places: &[f64], temperatures: &[f64], rates: &[f64]) -> Option<f64> {
        let sum = |weights: &[(usize, f64)]| weights.iter().map(|&(i, w)| w * rates[i]).sum::<f64>();
        Some(match self {
            Self::Weighted(weights) => sum(weights),
            Self::Hottest(all) => sum(&extreme(all, places, temperatures, 1.0)),
            Self::Coldest(all) => sum(&extreme(all, places, temperatures, -1.0)),
            Self::Difference(all) => {
                sum(&extreme(all, places, temperatures, 1.0)) - sum(&extreme(all, places, temperatures, -1.0))
            }
            Self::Rate(_) => return None,
        })
    }
}

/// The layers of a region as (first, last node).
fn segments(region: Region, mesh: &Mesh) -> Vec<(usize, usize)> {
    match region {
        Region::Whole => mesh.layers.clone(),
        Region::Layer(layer) => vec![mesh.layers[layer]],
    }
}

/// Weights of the volume mean.
fn volume_weights(region: Region, mesh: &Mesh) -> Vec<(usize, f64)> {
    let within = |layer: usize| match region {
        Region::Whole => true,
        Region::Layer(asked) => layer == asked,
    };
    let parts: Vec<_> = mesh.parts.iter().filter(|part| within(part.layer)).collect();
    let whole: f64 = parts.iter().map(|part| part.volume).sum();
    parts.iter().map(|part| (part.node, part.volume / whole)).collect()
}

/// Weights of the temperature at a place: the cubic through the four nearest nodes of its layer.
///
/// Its error is of order 4 in the cells, so the mesh decides about the accuracy, not the place.
fn place_weights(place: f64, mesh: &Mesh) -> Vec<(usize, f64)> {
    // The node of a mixed layer sits in its middle: where a layer ends is not said by its nodes.
    let layer = mesh.ends.partition_point(|&end| place > end * (1.0 + 1e-12)).min(mesh.layers.len() - 1);
    let (first, last) = mesh.layers[layer];
    let count = (last - first + 1).min(4);
    let after = first + mesh.places[first..=last].partition_point(|&node| node < place);
    let from = after.saturating_sub(count / 2).clamp(first, last + 1 - count);
    let nodes = from..from + count;
    let weight = |i: usize| {
        nodes
            .clone()
            .filter(|&j| j != i)
            .fold(1.0, |product, j| product * (place - mesh.places[j]) / (mesh.places[i] - mesh.places[j]))
    };
    nodes.clone().map(|i| (i, weight(i))).collect()
}

/// Weights of the highest (`sign` 1) or lowest (-1) temperature: the node, or inside a layer the vertex of the
/// parabola through it and its neighbours.
fn extreme(segments: &[(usize, usize)], places: &[f64], temperatures: &[f64], sign: f64) -> Weights {
    let (mut best, mut within) = (segments[0].0, segments[0]);
    for &(first, last) in segments {
        for i in first..=last {
            if sign * temperatures[i] > sign * temperatures[best] {
                (best, within) = (i, (first, last));
            }
        }
    }
    if best == within.0 || best == within.1 {
        return [(best, 1.0), (best, 0.0), (best, 0.0)];
    }
    vertex(best, places, temperatures)
}

/// Weights of the three nodes around `middle` at the vertex of their parabola.
fn vertex(middle: usize, places: &[f64], temperatures: &[f64]) -> Weights {
    let (before, after) = (places[middle] - places[middle - 1], places[middle + 1] - places[middle]);
    let rise = (temperatures[middle] - temperatures[middle - 1]) / before;
    let next = (temperatures[middle + 1] - temperatures[middle]) / after;
    let bend = (next - rise) / (before + after);
    if bend == 0.0 {
        return [(middle, 1.0), (middle, 0.0), (middle, 0.0)];
    }
    // Slope at the middle node, then the step from it to where the slope is nothing.
    let slope = rise + bend * before;
    let x = (-slope / (2.0 * bend)).clamp(-before, after);
    let low = x * (x - after) / (before * (before + after));
    let high = x * (x + before) / (after * (before + after));
    [(middle - 1, low), (middle, 1.0 - low - high), (middle + 1, high)]
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::item::Shape;
    use crate::mesh::{Line, LineLayer, line};

    fn mesh() -> Mesh {
        let layer = LineLayer { thickness: 1.0, mixed: false, joint_resists: false, cells: 9 };
        line(&Line { shape: Shape::Slab, layers: vec![layer, layer], active: [true, true] })
    }

    #[test]
    fn a_place_reads_a_cubic_exactly() {
        let mesh = mesh();
        let cubic = |x: f64| 300.0 + 3.0 * x - 7.0 * x * x + 2.0 * x * x * x;
        let temperatures: Vec<f64> = mesh.places.iter().map(|&x| cubic(x)).collect();
        for i in 0..=40 {
            let place = 2.0 * f64::from(i) / 40.0;
            let found = Gauge::new(Watch::Place(place), &mesh).value(&mesh.places, &temperatures, &[]);
            assert!((found - cubic(place)).abs() < 1e-10, "{place}: {found}");
        }
    }

    #[test]
    fn a_place_anywhere_in_a_mixed_layer_reads_its_one_temperature() {
        let still = LineLayer { thickness: 1.0, mixed: false, joint_resists: false, cells: 3 };
        let layers = vec![still, LineLayer { mixed: true, ..still }, still];
        let mesh = line(&Line { shape: Shape::Slab, layers, active: [true, true] });
        let temperatures: Vec<f64> = (0..mesh.nodes()).map(|i| 300.0 + 10.0 * i as f64).collect();
        for place in [1.01, 1.49, 1.51, 1.99] {
            let found = Gauge::new(Watch::Place(place), &mesh).value(&mesh.places, &temperatures, &[]);
            assert!((found - 340.0).abs() < 1e-10, "{place}: {found}");
        }
    }

    #[test]
    fn the_hottest_place_between_nodes_is_found() {
        let mesh = mesh();
        let temperatures: Vec<f64> =
            mesh.places.iter().map(|&x| 400.0 - 50.0 * (x - 0.6123) * (x - 0.6123)).collect();
        let found = Gauge::new(Watch::Hottest(Region::Whole), &mesh).value(&mesh.places, &temperatures, &[]);
        assert!((found - 400.0).abs() < 1e-10, "{found}");
    }
}
