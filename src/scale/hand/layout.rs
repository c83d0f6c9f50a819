//! The layers of an item as a chain of nodes: a still layer has one at each side, a mixed one a single one.

use crate::item::{Item, Layer, Motion, Region, Side, Watch};
use crate::matter::Law;
use crate::scale::chain::{Chain, End};
use crate::scale::outline;

/// Rounds of "conductivity at the mean temperature, temperatures from the conductivity".
const ROUNDS: usize = 60;

/// Until the temperatures no longer change by more than this, K.
const STEADY_WITHIN: f64 = 1e-9;

/// Where the layers lie, and which nodes are theirs.
#[derive(Clone, Debug)]
pub struct Layout<'a> {
    /// The item.
    pub item: &'a Item,
    /// Per layer: radius (slab: place) at its inner and its outer side, m.
    pub spans: Vec<(f64, f64)>,
    /// Per layer: first and last node; the same where mixed.
    pub nodes: Vec<(usize, usize)>,
}

impl<'a> Layout<'a> {
    /// The layout of an item.
    pub fn new(item: &'a Item) -> Self {
        let mut radius = item.shape().inner_radius();
        let mut next = 0;
        let (mut spans, mut nodes) = (Vec::new(), Vec::new());
        for layer in item.layers() {
            spans.push((radius, radius + layer.thickness));
            radius += layer.thickness;
            let last = if layer.motion == Motion::Still { next + 1 } else { next };
            nodes.push((next, last));
            next = last + 1;
        }
        Self { item, spans, nodes }
    }

    /// The layers.
    pub fn layers(&self) -> &'a [Layer] {
        self.item.layers()
    }

    /// Volume of a layer, m³.
    pub fn volume(&self, layer: usize) -> f64 {
        let (from, to) = self.spans[layer];
        outline::volume(self.item.shape(), from, to)
    }

    /// Area of a layer's inner (0) or outer (1) side, m².
    pub fn side_area(&self, layer: usize, side: usize) -> f64 {
        let (from, to) = self.spans[layer];
        outline::area(self.item.shape(), if side == 0 { from } else { to })
    }

    /// The chain with these conductivities, one per layer; the layer `uniform` has one temperature.
    pub fn chain(&self, conductivities: &[f64], ends: [End; 2], uniform: Option<usize>) -> Chain {
        let shape = self.item.shape();
        let mut to_next = Vec::new();
        for (number, layer) in self.layers().iter().enumerate() {
            let (from, to) = self.spans[number];
            if number > 0 {
                let film = |layer: &Layer| match layer.motion {
                    Motion::Still => 0.0,
                    Motion::Mixed { film } => 1.0 / film,
                };
                let joint = film(&self.layers()[number - 1]) + layer.contact + film(layer);
                to_next.push(joint / outline::area(shape, from));
            }
            if layer.motion == Motion::Still {
                let even = uniform == Some(number);
                let resistance = outline::resistance(shape, from, to, conductivities[number]);
                to_next.push(if even { 0.0 } else { resistance });
            }
        }
        Chain { to_next, ends }
    }

    /// Steady temperatures of the nodes, K, with each layer's conductivity at its mean; `guess` K gives the
    /// first. None where they do not settle.
    pub fn steady(&self, ends: [End; 2], uniform: Option<usize>, guess: f64) -> Option<Vec<f64>> {
        let nodes = self.nodes[self.nodes.len() - 1].1 + 1;
        let mut temperatures = vec![guess; nodes];
        for _ in 0..ROUNDS {
            let chain = self.chain(&self.conductivities(&temperatures), ends, uniform);
            let next = chain.temperatures(0, chain.settles(0)?);
            let change = next.iter().zip(&temperatures).map(|(a, b)| (a - b).abs()).fold(0.0, f64::max);
            temperatures = next;
            if change < STEADY_WITHIN {
                break;
            }
        }
        Some(temperatures)
    }

    /// Mean conductivity of each layer between the temperatures of its two sides.
    fn conductivities(&self, temperatures: &[f64]) -> Vec<f64> {
        let between = |(layer, &(first, last)): (&Layer, &(usize, usize))| {
            mean_value(&layer.conductivity, temperatures[first], temperatures[last])
        };
        self.layers().iter().zip(&self.nodes).map(between).collect()
    }

    /// Volume mean of a layer, K.
    pub fn mean(&self, layer: usize, temperatures: &[f64]) -> f64 {
        let ((from, to), (first, last)) = (self.spans[layer], self.nodes[layer]);
        let outwards = outline::mean_fraction(self.item.shape(), from, to);
        temperatures[first] + outwards * (temperatures[last] - temperatures[first])
    }

    /// The layer that holds a place at a distance from the inside, m.
    pub fn layer_at(&self, place: f64) -> usize {
        let radius = self.item.shape().inner_radius() + place;
        let reaches = |span: &(f64, f64)| radius <= span.1 * (1.0 + 1e-12);
        self.spans.iter().position(reaches).unwrap_or(self.spans.len() - 1)
    }

    /// The layers of a region.
    pub fn region(&self, region: Region) -> std::ops::Range<usize> {
        match region {
            Region::Whole => 0..self.spans.len(),
            Region::Layer(layer) => layer..layer + 1,
        }
    }

    /// Volume mean over a region of something known per layer.
    pub fn mean_over(&self, region: Region, per_layer: impl Fn(usize) -> f64) -> f64 {
        let (mut sum, mut whole) = (0.0, 0.0);
        for layer in self.region(region) {
            sum += self.volume(layer) * per_layer(layer);
            whole += self.volume(layer);
        }
        sum / whole
    }

    /// The watched temperature or difference, K, from the temperatures of the nodes; none for a rate.
    pub fn watched(&self, watch: Watch, temperatures: &[f64]) -> Option<f64> {
        let of = |region: Region| {
            let layers = self.region(region);
            &temperatures[self.nodes[layers.start].0..=self.nodes[layers.end - 1].1]
        };
        let hottest = |region| of(region).iter().copied().fold(f64::NEG_INFINITY, f64::max);
        let coldest = |region| of(region).iter().copied().fold(f64::INFINITY, f64::min);
        match watch {
            Watch::Hottest(region) => Some(hottest(region)),
            Watch::Coldest(region) => Some(coldest(region)),
            Watch::Difference(region) => Some(hottest(region) - coldest(region)),
            Watch::Mean(region) => Some(self.mean_over(region, |layer| self.mean(layer, temperatures))),
            Watch::Place(place) => Some(self.at(place, temperatures)),
            Watch::Face(Side::Inner) => Some(temperatures[0]),
            Watch::Face(Side::Outer) => Some(temperatures[temperatures.len() - 1]),
            Watch::Rate(_) => None,
        }
    }

    fn at(&self, place: f64, temperatures: &[f64]) -> f64 {
        let layer = self.layer_at(place);
        let ((from, to), (first, last)) = (self.spans[layer], self.nodes[layer]);
        let radius = (self.item.shape().inner_radius() + place).clamp(from, to);
        let outwards = outline::fraction(self.item.shape(), from, to, radius);
        temperatures[first] + outwards * (temperatures[last] - temperatures[first])
    }
}

/// The mean of a property between two temperatures.
pub fn mean_value(law: &Law, a: f64, b: f64) -> f64 {
    // Closer together than this the difference of the integrals has lost its digits.
    const TOGETHER: f64 = 1e-3;
    if (a - b).abs() < TOGETHER {
        law.value(0.5 * (a + b))
    } else {
        (law.integral(a) - law.integral(b)) / (a - b)
    }
}

/// How much a property varies between two temperatures, as a part of its mean.
pub fn variation(law: &Law, a: f64, b: f64) -> f64 {
    const LOOKS: u32 = 8;
    if law.constant().is_some() {
        return 0.0;
    }
    let values = (0..=LOOKS).map(|i| law.value(a + (b - a) * f64::from(i) / f64::from(LOOKS)));
    let (low, high) =
        values.fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), v| (low.min(v), high.max(v)));
    2.0 * (high - low) / (high + low)
}
