//! The layer that stores most as a body with one temperature, and what pulls at it.
//!
//! All it stores leaves it through the resistances of the layers around it and the films. A layer around it
//! counts with the square of the share in which it follows (a third of a lagging that is cold outside):
//! Rayleigh's quotient for the slowest decay (Rayleigh 1877).

use super::layout::Layout;
use super::towards;
use super::view::View;
use crate::item::{Condition, Watch};
use crate::scale::chain::{Chain, Outside};
use crate::scale::lumped::{exponential_time, flow_time, radiation_time};

/// Two temperatures closer than this are the same, K.
const SAME: f64 = 1e-9;

/// How the body comes nearer to where it settles.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Course {
    /// By a given flux alone, evenly.
    Driven,
    /// By films alone, exponentially.
    ByFilm,
    /// By radiation alone: from `area` (m², times emissivity) to a temperature (K).
    ByRadiation {
        /// m²
        area: f64,
        /// K
        towards: f64,
    },
    /// By both.
    ByBoth,
}

/// The body and what pulls at it.
pub struct Body<'a> {
    /// The layers.
    pub layout: &'a Layout<'a>,
    /// The chain, with no resistance inside the body.
    pub chain: Chain,
    /// The layer that is the body.
    pub layer: usize,
    /// Its first node.
    pub node: usize,
    /// J/K, with the share of the layers around.
    pub capacity: f64,
    /// Part of it that the layers around hold.
    pub around: f64,
    /// K, with what the layers around begin with.
    pub start: f64,
    /// K; none where nothing draws.
    pub settles: Option<f64>,
    /// Volume mean of the share in which each layer follows.
    follows: Vec<f64>,
}

impl<'a> Body<'a> {
    /// The body for a condition; none where a face holds it, or where it would settle nowhere.
    pub fn new(view: &'a View<'a>, condition: &Condition) -> Option<Self> {
        let layout = &view.layout;
        let layer = view.store();
        let node = layout.nodes[layer].0;
        let chain = view.chain(Some(layer));
        let settles = chain.settles(node);
        let draws = chain.ends.iter().any(|end| end.outside.draws());
        if chain.pinned(node).is_some() || (settles.is_none() && draws) {
            return None;
        }
        let own = view.start[layer].mean;
        let to = settles.unwrap_or(own);
        let shares = chain.shares(node, 0.5 * (own + to));
        let all = 0..view.start.len();
        let follows: Vec<f64> = all.clone().map(|layer| layout.mean(layer, &shares)).collect();
        let square = |layer: usize| {
            let (a, b) = (shares[layout.nodes[layer].0], shares[layout.nodes[layer].1]);
            (a * a + a * b + b * b) / 3.0
        };
        let on_the_way = view.capacity_between(layer, own, towards(condition, own, to));
        let capacity = |number: usize| if number == layer { on_the_way } else { view.capacity(number) };
        let whole: f64 = all.clone().map(|layer| capacity(layer) * square(layer)).sum();
        let settled = chain.temperatures(node, to);
        let above = |layer: usize| view.start[layer].mean - layout.mean(layer, &settled);
        let excess: f64 = all.map(|layer| capacity(layer) * follows[layer] * above(layer)).sum();
        let around = 1.0 - on_the_way / whole;
        Some(Self {
            layout,
            chain,
            layer,
            node,
            capacity: whole,
            around: if view.start.len() == 1 { 0.0 } else { around },
            start: to + excess / whole,
            settles,
            follows,
        })
    }

    /// What a condition watches while the body has a temperature.
    pub fn watched(&self, watch: Watch, temperature: f64) -> f64 {
        if let Watch::Rate(region) = watch {
            let follows = self.layout.mean_over(region, |layer| self.follows[layer]);
            return follows * self.lost(temperature).abs() / self.capacity;
        }
        let nodes = self.chain.temperatures(self.node, temperature);
        self.layout.watched(watch, &nodes).unwrap_or(temperature)
    }

    /// Heat lost, W.
    pub fn lost(&self, temperature: f64) -> f64 {
        self.chain.flows(self.node, temperature).iter().sum()
    }

    /// The way to a temperature in time constants, about; 1 where nothing draws.
    pub fn decays(&self, to: f64) -> f64 {
        self.settles.map_or(1.0, |settles| libm::log((self.start - settles) / (to - settles)))
    }

    /// How it comes nearer to where it settles.
    pub fn course(&self) -> Course {
        if self.settles.is_none() {
            return Course::Driven;
        }
        let radiates =
            |outside: Outside| matches!(outside, Outside::Exchange { emissivity, .. } if emissivity > 0.0);
        if !self.chain.ends.iter().any(|end| radiates(end.outside)) {
            return Course::ByFilm;
        }
        self.radiates_alone().map_or(Course::ByBoth, |(area, towards)| Course::ByRadiation { area, towards })
    }

    /// Of a bare body without any film: area times emissivity (m²) and the temperature radiated to (K).
    fn radiates_alone(&self) -> Option<(f64, f64)> {
        let mut sum = 0.0;
        let mut towards = None;
        let resistances = self.chain.resistances(self.node);
        for (end, resistance) in self.chain.ends.iter().zip(resistances) {
            match end.outside {
                Outside::Given(0.0) => {}
                Outside::Exchange { film: 0.0, emissivity, radiation_to, .. }
                    if resistance == 0.0
                        && towards.is_none_or(|other: f64| (other - radiation_to).abs() < SAME) =>
                {
                    sum += end.area * emissivity;
                    towards = Some(radiation_to);
                }
                Outside::Given(_) | Outside::Held(_) | Outside::Exchange { .. } => return None,
            }
        }
        towards.map(|towards| (sum, towards))
    }

    /// Time until the body has a temperature between start and where it settles, s.
    pub fn time(&self, to: f64, settles: f64) -> f64 {
        let start = self.start;
        match self.course() {
            Course::Driven => self.capacity * (start - to) / self.lost(start),
            Course::ByFilm => {
                let resistance = (start - settles) / self.lost(start);
                exponential_time(self.capacity, resistance, start, to, settles)
            }
            Course::ByRadiation { area, towards } => radiation_time(self.capacity, area, start, to, towards),
            Course::ByBoth => flow_time(self.capacity, |t| self.lost(t), start, to, settles),
        }
    }
}
