//! The thick wall, applied to the layer behind a face of an item.

use super::layout::{mean_value, variation};
use super::surroundings;
use super::verdict::{Found, Verdict, figure, percent};
use super::view::View;
use super::{Gives, reached};
use crate::item::{Condition, Motion, Region, Shape, Side, Watch};
use crate::scale::chain::{End, Outside};
use crate::scale::numbers::{THICK_BELOW, diffusivity, fourier};
use crate::scale::thick::{Step, Wall};
use crate::units::words;

const NAME: &str = "thick wall";
const FORMULA: &str = "face held: (T - T start) / (T face - T start) = erfc(n), n = x / (2 sqrt(a t)), \
    a = k / (rho c); film: erfc(n) - exp(h x / k + h^2 a t / k^2) erfc(n + h sqrt(a t) / k); flux: T - T start = \
    (q / k) (2 sqrt(a t / pi) exp(-n^2) - x erfc(n)) (Carslaw and Jaeger 1959, sections 2.4, 2.7, 2.9)";

/// Above this Fourier number the formula has nothing to do with the item any more.
const OF_INTEREST: f64 = 0.5;

/// The far side may add up to this part.
const FAR_SIDE_BELOW: f64 = 0.05;

/// Heat may have come this deep, as a part of the radius of curvature (of a sphere half its radius).
const CURVED_BELOW: f64 = 0.05;

/// Film and radiation together may change by this part on the way; their mean is taken.
const RADIATION_BELOW: f64 = 0.1;

/// Properties may vary by this part; their mean is taken.
const VARIES_BELOW: f64 = 0.2;

/// The start may be uneven by this part of the change at the place.
const UNEVEN_BELOW: f64 = 0.05;

/// A layer behind a face, and the place in it that is watched.
struct Behind<'a> {
    view: &'a View<'a>,
    layer: usize,
    /// 0 inner, 1 outer.
    side: usize,
    /// m below the face
    depth: f64,
    wall: Wall,
    step: Step,
    /// Face temperature for which radiation is taken, K, and how much the film changes for it.
    radiates: Option<(f64, f64)>,
}

/// The formula for a condition, behind the face from which it is reached first; none where it has nothing to
/// say.
pub fn thick_wall(view: &View<'_>, condition: &Condition) -> Option<Found> {
    let timed = |side: usize| {
        let behind = Behind::new(view, condition, side)?;
        let time = behind.time(condition)?;
        (behind.fourier(time) < OF_INTEREST).then_some((behind, time))
    };
    let first = (0..2).filter_map(timed).min_by(|a, b| a.1.total_cmp(&b.1));
    let (behind, time) = first?;
    Some(behind.verdict(time, condition.limit).found(NAME, FORMULA, Gives::Time(time)))
}

impl<'a> Behind<'a> {
    fn new(view: &'a View<'a>, condition: &Condition, side: usize) -> Option<Self> {
        let end = view.now[side];
        let layer = if side == 0 { 0 } else { view.start.len() - 1 };
        let still = view.layout.layers()[layer].motion == Motion::Still;
        if !still || end.outside == Outside::Given(0.0) {
            return None;
        }
        let start = view.start[layer].mean;
        let depth = depth(view, condition.watch, side, layer, rises(end, start)?)?;
        let materials = &view.layout.layers()[layer];
        let wall = Wall {
            conductivity: mean_value(&materials.conductivity, start, condition.limit),
            capacity: mean_value(&materials.capacity, start, condition.limit),
            start,
        };
        let (step, radiates) = step(end, start, (depth == 0.0).then_some(condition.limit));
        Some(Self { view, layer, side, depth, wall, step, radiates })
    }

    /// When the condition is reached, s.
    fn time(&self, condition: &Condition) -> Option<f64> {
        if reached(condition, self.wall.start) {
            return None;
        }
        let thickness = self.view.layout.layers()[self.layer].thickness;
        self.wall.time(self.step, self.depth, thickness, condition.limit)
    }

    /// Fourier number at a time, on the thickness.
    fn fourier(&self, time: f64) -> f64 {
        let thickness = self.view.layout.layers()[self.layer].thickness;
        fourier(diffusivity(self.wall.conductivity, self.wall.capacity), time, thickness)
    }

    fn verdict(&self, time: f64, limit: f64) -> Verdict {
        let mut verdict = Verdict::new();
        let thickness = self.view.layout.layers()[self.layer].thickness;
        let diffusivity = diffusivity(self.wall.conductivity, self.wall.capacity);
        let number = self.fourier(time);
        let far = self.far_side(time, thickness);
        let thick = number < THICK_BELOW && far < FAR_SIDE_BELOW;
        let than = if number < THICK_BELOW { "below" } else { "not below" };
        verdict.say(thick, format!("Fourier number {}, {than} {THICK_BELOW}", figure(number)));
        verdict.doubt(far);
        let (from, to) = self.view.layout.spans[self.layer];
        let radius = if self.side == 0 { from } else { to };
        let curved = (diffusivity * time).sqrt()
            * match self.view.item().shape() {
                Shape::Slab => 0.0,
                Shape::Cylinder { .. } => 1.0 / radius,
                Shape::Sphere { .. } => 2.0 / radius,
            };
        verdict.unless(curved < CURVED_BELOW, || "too curved by then to count as flat".to_owned());
        verdict.doubt(curved);
        self.constancy(limit, &mut verdict);
        let span = (limit - self.wall.start).abs();
        verdict.object(surroundings::not_counted(self.view.item(), time, span));
        verdict
    }

    /// What the far side adds, as a part: its mirror image, or its own surroundings.
    fn far_side(&self, time: f64, thickness: f64) -> f64 {
        let reach = 2.0 * (diffusivity(self.wall.conductivity, self.wall.capacity) * time).sqrt();
        let alone = self.view.start.len() == 1;
        let closed = alone && self.view.now[1 - self.side].outside == Outside::Given(0.0);
        let away = if closed { 2.0 * thickness - self.depth } else { thickness - self.depth };
        libm::erfc(away / reach) / libm::erfc(self.depth / reach).max(f64::MIN_POSITIVE)
    }

    /// What the formula takes as constant and even.
    fn constancy(&self, limit: f64, verdict: &mut Verdict) {
        let layer = &self.view.layout.layers()[self.layer];
        for (what, law) in [("conductivity", &layer.conductivity), ("heat capacity", &layer.capacity)] {
            let varies = variation(law, self.wall.start, limit);
            verdict.unless(varies < VARIES_BELOW, || format!("its {what} varies by {}", percent(varies)));
            verdict.doubt(0.2 * varies);
        }
        if let Some((face, change)) = self.radiates {
            let words = format!("radiation as at a face of {}", words::temperature(face));
            verdict.say(change < RADIATION_BELOW, words);
            verdict.doubt(0.5 * change);
        }
        let uneven = self.view.start[self.layer].spread / (limit - self.wall.start).abs();
        verdict.unless(uneven < UNEVEN_BELOW, || "the start is not uniform: its mean is counted".to_owned());
    }
}

/// Does the face warm? None where it stays as it is.
fn rises(end: End, start: f64) -> Option<bool> {
    let drive = match end.outside {
        Outside::Given(flux) => flux,
        Outside::Held(_) | Outside::Exchange { .. } => end.outside.as_film(start)?.1 - start,
    };
    (drive != 0.0).then_some(drive > 0.0)
}

/// How deep below the face of a layer the watched place lies, m; none where it does not lie there.
fn depth(view: &View<'_>, watch: Watch, side: usize, layer: usize, rises: bool) -> Option<f64> {
    // Of the whole item the extreme lies at this face only where nothing acts on the other one.
    let alone = view.now[1 - side].outside == Outside::Given(0.0) || view.start.len() == 1;
    let here = |region: Region| region == Region::Layer(layer) || (region == Region::Whole && alone);
    match watch {
        Watch::Face(Side::Inner) => (side == 0).then_some(0.0),
        Watch::Face(Side::Outer) => (side == 1).then_some(0.0),
        Watch::Hottest(region) => (here(region) && rises).then_some(0.0),
        Watch::Coldest(region) => (here(region) && !rises).then_some(0.0),
        Watch::Place(place) if view.layout.layer_at(place) == layer => {
            let depth = if side == 0 { place } else { view.item().thickness() - place };
            Some(depth.max(0.0))
        }
        Watch::Place(_) | Watch::Mean(_) | Watch::Difference(_) | Watch::Rate(_) => None,
    }
}

/// What happens at the face, with radiation taken at the mean of the face's way; `to` K where that is known.
fn step(end: End, start: f64, to: Option<f64>) -> (Step, Option<(f64, f64)>) {
    match end.outside {
        Outside::Given(flux) => (Step::Flux(flux), None),
        Outside::Held(to) => (Step::Held(to), None),
        Outside::Exchange { film, temperature, emissivity, .. } => {
            let as_film = |face: f64| end.outside.as_film(face).unwrap_or((film, temperature));
            let late = to.unwrap_or(as_film(start).1);
            let face = 0.5 * (start + late);
            let (both, surroundings) = as_film(face);
            let change = (as_film(start).0 - as_film(late).0).abs() / both;
            (Step::Film(both, surroundings), (emissivity > 0.0).then_some((face, change)))
        }
    }
}
