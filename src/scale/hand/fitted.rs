//! The layer that stores most as one of the three bodies of the series, with all between it and the
//! surroundings as its film.

use super::layout::Layout;
use super::towards;
use super::view::View;
use crate::item::{Condition, Motion, Shape};
use crate::scale::chain::{Chain, End, Outside};
use crate::scale::series::{Body, OneTerm};

/// A hollow layer thinner than this part of its outer radius is taken as flat.
const FLAT_BELOW: f64 = 0.1;

/// How the layer that stores most fits one of the three bodies.
#[derive(Clone, Copy, Debug)]
pub struct Fit {
    /// Which series.
    pub body: Body,
    /// m
    pub length: f64,
    /// Through which side heat passes: 0 inner, 1 outer.
    pub side: usize,
    /// Do both sides see the same?
    pub both: bool,
    /// Is it hollow and taken as flat?
    pub flat: bool,
}

/// Does the layer that stores most fit one of the three bodies?
pub fn fit(view: &View<'_>, layer: usize) -> Option<Fit> {
    let driven = |end: &End| matches!(end.outside, Outside::Given(flux) if flux != 0.0);
    if view.layout.layers()[layer].motion != Motion::Still || view.now.iter().any(driven) {
        return None;
    }
    let (from, to) = view.layout.spans[layer];
    let draws = [view.now[0].outside.draws(), view.now[1].outside.draws()];
    let shape = view.item().shape();
    let (side, both) = match draws {
        [false, false] => return None,
        [true, false] => (0, false),
        [false, true] => (1, false),
        [true, true] => {
            let twice = view.start.len() == 1 && view.now[0] == view.now[1] && shape == Shape::Slab;
            twice.then_some((1, true))?
        }
    };
    let length = if both { 0.5 * (to - from) } else { to - from };
    match shape {
        Shape::Cylinder { .. } if from == 0.0 => {
            Some(Fit { body: Body::Cylinder, length, side, both, flat: false })
        }
        Shape::Sphere { .. } if from == 0.0 => {
            Some(Fit { body: Body::Sphere, length, side, both, flat: false })
        }
        Shape::Slab => Some(Fit { body: Body::Slab, length, side, both, flat: false }),
        Shape::Cylinder { .. } | Shape::Sphere { .. } => {
            (to - from < FLAT_BELOW * to).then_some(Fit { body: Body::Slab, length, side, both, flat: true })
        }
    }
}

/// All between the layer and its surroundings as one film, W/(m² K), and the temperature of the face for
/// which radiation is taken, K.
pub fn film(
    view: &View<'_>,
    layer: usize,
    fit: Fit,
    chain: &Chain,
    condition: &Condition,
) -> (f64, Option<f64>) {
    let (first, last) = view.layout.nodes[layer];
    let node = if fit.side == 0 { first } else { last };
    let area = view.layout.side_area(layer, fit.side);
    let resistance = chain.resistances(node)[fit.side];
    // Half way: the mean of a body lies this far behind its face (parabolic profile).
    let parts = match fit.body {
        Body::Slab => 3.0,
        Body::Cylinder => 4.0,
        Body::Sphere => 5.0,
    };
    let within = fit.length / (parts * view.conductivities[layer] * area);
    let (start, settles) = (view.start[layer].mean, view.settles[layer]);
    let late = towards(condition, start, settles);
    let end = chain.ends[fit.side];
    let face = end.face(resistance + within, 0.5 * (start + late));
    let film = end.outside.as_film(face).map_or(0.0, |(film, _)| film);
    let overall = 1.0 / (area * (resistance + 1.0 / (end.area * film)));
    let radiates = matches!(end.outside, Outside::Exchange { emissivity, .. } if emissivity > 0.0);
    (overall, radiates.then_some(face))
}

/// First term at Fo = 0 at each node: in the layer by the series, beyond it falling off with the resistance.
pub fn amplitudes(
    layout: &Layout<'_>,
    layer: usize,
    fit: Fit,
    chain: &Chain,
    term: &OneTerm,
    film: f64,
) -> Vec<f64> {
    let (first, last) = layout.nodes[layer];
    let still = if fit.both { term.at(1.0) } else { term.at(0.0) };
    let face = term.at(1.0);
    let mut all = vec![still; chain.to_next.len() + 1];
    let flow = face * film * layout.side_area(layer, fit.side);
    if fit.side == 1 {
        all[last] = face;
        for i in last..chain.to_next.len() {
            all[i + 1] = all[i] - flow * chain.to_next[i];
        }
    } else {
        all[first] = face;
        for i in (0..first).rev() {
            all[i] = all[i + 1] - flow * chain.to_next[i];
        }
    }
    all
}
