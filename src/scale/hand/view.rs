//! What a hand calculation sees of an item: constant properties, the surroundings of the stop, layer means.

use super::layout::{Layout, mean_value, variation};
use super::reached;
use super::surroundings;
use crate::item::{Condition, Item, Motion, Region, Start, Watch};
use crate::scale::chain::{Chain, End, Outside};
use crate::scale::outline;
use crate::scale::roots::bisect;

/// A start that varies by less than this is even, K.
const EVEN: f64 = 1e-9;

/// Where the search for an earlier steady state begins, K; it ends at the same place from anywhere.
const FIRST_GUESS: f64 = 300.0;

/// Shells over which a start profile is averaged.
const SHELLS: u32 = 64;

/// Where a layer begins.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Began {
    /// Volume mean, K.
    pub mean: f64,
    /// At its inner and its outer side, K; of a mixed layer its mean.
    pub sides: [f64; 2],
    /// Hottest minus coldest, K.
    pub spread: f64,
}

/// An item as a hand calculation sees it.
#[derive(Clone, Debug)]
pub struct View<'a> {
    /// Its layers and nodes.
    pub layout: Layout<'a>,
    /// What the faces see at the stop.
    pub now: [End; 2],
    /// Per layer.
    pub start: Vec<Began>,
    /// Per layer, the mean temperature at which it settles, K; the start where nothing settles.
    pub settles: Vec<f64>,
    /// Per layer, W/(m K): of the layer that stores most the mean between start and where it settles; of the
    /// others, across which the difference lies, the mean between half way and where they settle.
    pub conductivities: Vec<f64>,
}

impl<'a> View<'a> {
    /// The view of an item.
    pub fn new(item: &'a Item) -> Self {
        let layout = Layout::new(item);
        let now = surroundings::now(item);
        let start = start(&layout);
        let settled = settles(&layout, now, &start);
        let number = 0..item.layers().len();
        let settles: Vec<f64> = number
            .map(|layer| settled.as_ref().map_or(start[layer].mean, |nodes| layout.mean(layer, nodes)))
            .collect();
        let mut view = Self { layout, now, start, settles, conductivities: Vec::new() };
        let (store, all) = (view.store(), 0..item.layers().len());
        view.conductivities = all.map(|layer| view.conductivity(layer, store)).collect();
        view
    }

    fn conductivity(&self, layer: usize, store: usize) -> f64 {
        let (start, settles) = (self.start[layer].mean, self.settles[layer]);
        let from = if layer == store { start } else { 0.5 * (start + settles) };
        mean_value(&self.layout.layers()[layer].conductivity, from, settles)
    }

    /// The item.
    pub fn item(&self) -> &'a Item {
        self.layout.item
    }

    /// The layer that stores most.
    pub fn store(&self) -> usize {
        let number = 0..self.start.len();
        number.max_by(|&a, &b| self.capacity(a).total_cmp(&self.capacity(b))).unwrap_or(0)
    }

    /// Heat capacity of a layer, J/K, at the mean of start and where it settles.
    pub fn capacity(&self, layer: usize) -> f64 {
        self.capacity_between(layer, self.start[layer].mean, self.settles[layer])
    }

    /// Heat capacity of a layer, J/K, between two temperatures.
    pub fn capacity_between(&self, layer: usize, a: f64, b: f64) -> f64 {
        mean_value(&self.layout.layers()[layer].capacity, a, b) * self.layout.volume(layer)
    }

    /// The layers as a chain at the stop.
    pub fn chain(&self, uniform: Option<usize>) -> Chain {
        self.layout.chain(&self.conductivities, self.now, uniform)
    }

    /// How much the conductivity of a layer varies on the way, as a part of it.
    pub fn conductivity_varies(&self, layer: usize) -> f64 {
        let law = &self.layout.layers()[layer].conductivity;
        variation(law, self.start[layer].mean, self.settles[layer])
    }

    /// How much the resistance between a node and its surroundings varies with the conductivities of the layers
    /// other than `store`, as a part of it.
    pub fn resistance_varies(&self, chain: &Chain, store: usize) -> f64 {
        let others = (0..self.start.len()).filter(|&layer| layer != store);
        let varying = others.map(|layer| {
            let (first, last) = self.layout.nodes[layer];
            chain.to_next[first..last].iter().sum::<f64>() * self.conductivity_varies(layer)
        });
        let node = self.layout.nodes[store].0;
        let conductance: f64 = chain.conductances(node, self.start[store].mean).iter().sum();
        (varying.sum::<f64>() * conductance).min(1.0)
    }

    /// How much the heat capacity of a layer varies on the way, as a part of it.
    pub fn capacity_varies(&self, layer: usize) -> f64 {
        let law = &self.layout.layers()[layer].capacity;
        variation(law, self.start[layer].mean, self.settles[layer])
    }

    /// The watched temperature or difference at the start, K; none for a rate.
    fn watched_at_start(&self, watch: Watch) -> Option<f64> {
        let per_layer = self.layout.nodes.iter().zip(&self.start);
        let nodes: Vec<f64> =
            per_layer.flat_map(|(&(first, last), began)| began.sides[..=last - first].to_vec()).collect();
        self.layout.watched(watch, &nodes)
    }

    /// Does a condition hold from the start? Of a rate nothing is known.
    pub fn holds_at_start(&self, condition: &Condition) -> bool {
        self.watched_at_start(condition.watch).is_some_and(|value| reached(condition, value))
    }

    /// Does all begin at one temperature?
    pub fn begins_even(&self) -> bool {
        let first = self.start[0].mean;
        self.start.iter().all(|began| began.spread < EVEN && (began.mean - first).abs() < EVEN)
    }

    /// What is said where a watched rate or difference begins low and rises before it falls.
    pub fn begins_low(&self, watch: Watch) -> Option<String> {
        let low = match watch {
            Watch::Rate(_) => self.start.len() > 1 || !self.begins_even(),
            Watch::Difference(_) => self.begins_even(),
            Watch::Hottest(_) | Watch::Coldest(_) | Watch::Mean(_) | Watch::Place(_) | Watch::Face(_) => {
                false
            }
        };
        low.then(|| "it may begin lower: what is given is when it falls for good".to_owned())
    }

    /// Is a layer other than `store` watched?
    pub fn watches_others(&self, watch: Watch, store: usize) -> bool {
        let cools = self.start[store].mean > self.settles[store];
        match watch {
            Watch::Hottest(Region::Layer(layer))
            | Watch::Coldest(Region::Layer(layer))
            | Watch::Mean(Region::Layer(layer))
            | Watch::Difference(Region::Layer(layer))
            | Watch::Rate(Region::Layer(layer)) => layer != store,
            Watch::Place(place) => self.layout.layer_at(place) != store,
            Watch::Hottest(Region::Whole) => !cools,
            Watch::Coldest(Region::Whole) => cools,
            Watch::Mean(Region::Whole)
            | Watch::Difference(Region::Whole)
            | Watch::Rate(Region::Whole)
            | Watch::Face(_) => self.start.len() > 1,
        }
    }

    /// Sum of the times in which the layers other than `store` follow, s: their diffusion times, or heat
    /// capacity over the film of a mixed one.
    pub fn lag(&self, store: usize) -> f64 {
        let own = |layer: usize| {
            let what = &self.layout.layers()[layer];
            let capacity = self.capacity(layer);
            match what.motion {
                Motion::Mixed { film } => capacity / (film * self.layout.side_area(layer, 1)),
                Motion::Still => {
                    let square = what.thickness * what.thickness;
                    square * capacity / (self.conductivities[layer] * self.layout.volume(layer))
                }
            }
        };
        (0..self.start.len()).filter(|&layer| layer != store).map(own).sum()
    }
}

/// Steady temperatures of the nodes, K; where everything is insulated, those of heat shared out.
pub fn settles(layout: &Layout<'_>, ends: [End; 2], start: &[Began]) -> Option<Vec<f64>> {
    let guess = layout.mean_over(Region::Whole, |layer| start[layer].mean);
    if ends.iter().any(|end| end.outside.draws()) {
        return layout.steady(ends, None, guess);
    }
    let insulated = ends.iter().all(|end| end.outside == Outside::Given(0.0));
    let nodes = layout.nodes[layout.nodes.len() - 1].1 + 1;
    insulated.then(|| vec![shared_out(layout, start); nodes])
}

/// The temperature at which the layers store together what they store at the start, K.
fn shared_out(layout: &Layout<'_>, start: &[Began]) -> f64 {
    let too_much = |temperature: f64| {
        let layers = layout.layers().iter().zip(start).enumerate();
        let more = layers.map(|(number, (layer, began))| {
            layout.volume(number)
                * (layer.capacity.integral(temperature) - layer.capacity.integral(began.mean))
        });
        more.sum::<f64>()
    };
    let means = start.iter().map(|began| began.mean);
    let (low, high) = means.fold((f64::INFINITY, 0.0_f64), |(low, high), t| (low.min(t), high.max(t)));
    if low < high { bisect(low, high, too_much) } else { low }
}

fn start(layout: &Layout<'_>) -> Vec<Began> {
    let layers = 0..layout.spans.len();
    let even = |mean: f64| Began { mean, sides: [mean; 2], spread: 0.0 };
    match layout.item.start() {
        Start::Uniform(temperature) => layers.map(|_| even(*temperature)).collect(),
        Start::PerLayer(temperatures) => temperatures.iter().copied().map(even).collect(),
        Start::Profile(points) => layers.map(|layer| averaged(layout, layer, points)).collect(),
        Start::SteadyBefore { contents, inner, outer } => {
            let mut ends = surroundings::of_faces(layout.item, inner, outer);
            if let Some(temperature) = contents {
                ends[0].outside = Outside::Held(*temperature);
            }
            let guess = contents.unwrap_or(FIRST_GUESS);
            let uniform = contents.map(|_| 0);
            let nodes = layout.nodes[layout.nodes.len() - 1].1 + 1;
            let steady = layout.steady(ends, uniform, guess).unwrap_or_else(|| vec![guess; nodes]);
            let began = |layer: usize| {
                let (first, last) = layout.nodes[layer];
                let sides = [steady[first], steady[last]];
                Began { mean: layout.mean(layer, &steady), sides, spread: (sides[0] - sides[1]).abs() }
            };
            layers.map(began).collect()
        }
    }
}

/// A layer of a start profile, (distance from the inside, m; K).
fn averaged(layout: &Layout<'_>, layer: usize, points: &[(f64, f64)]) -> Began {
    let (from, to) = layout.spans[layer];
    let inside = layout.item.shape().inner_radius();
    let (mut sum, mut low, mut high) = (0.0, f64::INFINITY, f64::NEG_INFINITY);
    let edge = |i: u32| from + (to - from) * f64::from(i) / f64::from(SHELLS);
    for i in 0..SHELLS {
        let temperature = on_profile(points, 0.5 * (edge(i) + edge(i + 1)) - inside);
        sum += outline::volume(layout.item.shape(), edge(i), edge(i + 1)) * temperature;
        (low, high) = (low.min(temperature), high.max(temperature));
    }
    let mean = sum / layout.volume(layer);
    let (first, last) = layout.nodes[layer];
    let sides = if first == last { [mean; 2] } else { [from, to].map(|at| on_profile(points, at - inside)) };
    Began { mean, sides, spread: high - low }
}

/// On the straight lines between the points; the end values outside.
fn on_profile(points: &[(f64, f64)], place: f64) -> f64 {
    let after = points.partition_point(|point| point.0 <= place);
    let Some(&(x1, t1)) = points.get(after) else { return points[points.len() - 1].1 };
    if after == 0 {
        return t1;
    }
    let (x0, t0) = points[after - 1];
    t0 + (t1 - t0) * (place - x0) / (x1 - x0)
}
