//! One term of the series, applied to an item: to the layer that stores most, with all that lies between it
//! and the surroundings as its film.
//!
//! What the layers around store counts by Rayleigh's quotient (Rayleigh 1877): it slows the decay by the part
//! it adds to the heat stored by the square of the profile, and adds what it begins with.

use super::around::Around;
use super::fitted::{Fit, amplitudes, film, fit};
use super::surroundings;
use super::verdict::{Found, Verdict, figure, percent};
use super::view::View;
use super::{Gives, reached};
use crate::item::{Condition, Region, Sense, Side, Watch};
use crate::scale::chain::Chain;
use crate::scale::numbers::{ONE_TERM_ABOVE, biot, diffusivity, fourier};
use crate::scale::series::OneTerm;
use crate::units::words;

const NAME: &str = "one term of the series";
const FORMULA: &str = "(T - T surroundings) / (T start - T surroundings) = C exp(-zeta^2 Fo) X(zeta x / L), \
    Fo = k t / (rho c L^2), Bi = h L / k; slab zeta tan zeta = Bi, X = cos; cylinder zeta J1/J0 = Bi, X = J0; \
    sphere 1 - zeta cot zeta = Bi, X = sin(z)/z (Heisler 1947; Carslaw and Jaeger 1959, sections 3.11, 7.7, \
    9.4; layers around it by Rayleigh 1877)";

/// A smaller difference than this is none, K.
const NOTHING_DECAYS: f64 = 1e-9;

/// What the layers around hold, times the Biot number: above it they decide how the face follows.
const AT_THE_FACE_BELOW: f64 = 0.2;

/// The second term may shift the time by this part.
const SECOND_BELOW: f64 = 0.03;

/// The film may change by this part on the way, for radiation; its mean is taken.
const RADIATION_BELOW: f64 = 0.2;

/// Properties may vary by this part; their mean is taken.
const VARIES_BELOW: f64 = 0.2;

/// The start may be uneven by this part of the difference that decays.
const UNEVEN_BELOW: f64 = 0.05;

/// The layer as a body with a film.
struct Series<'a> {
    view: &'a View<'a>,
    layer: usize,
    fit: Fit,
    chain: Chain,
    term: OneTerm,
    biot: f64,
    /// Temperature of the outermost face for which radiation is taken, K; none without radiation.
    radiates_at: Option<f64>,
    /// K, of the surroundings.
    towards: f64,
    /// First term at Fo = 0 at each node.
    amplitudes: Vec<f64>,
    /// Part of the heat that the layers around hold.
    around: f64,
    /// What the layers around make of the first term at Fo = 0.
    gain: f64,
}

/// The formula for a condition; none where it has nothing to say.
pub fn one_term(view: &View<'_>, condition: &Condition) -> Option<Found> {
    let series = Series::new(view, condition)?;
    let start = view.start[series.layer].mean;
    let difference = start - series.towards;
    let (amplitude, remaining) = series.asked(condition, difference);
    if remaining <= 0.0 {
        let beyond = Gives::Never { settles_at: series.towards };
        let never = !reached(condition, start) && !reached(condition, series.towards);
        return never.then(|| series.verdict(f64::INFINITY).found(NAME, FORMULA, beyond));
    }
    let falls = matches!(condition.watch, Watch::Difference(_) | Watch::Rate(_)) || difference > 0.0;
    if falls != (condition.sense == Sense::Below) || amplitude <= remaining {
        return None;
    }
    let time = series.term.fourier(amplitude, remaining) / (series.fourier(1.0) * (1.0 - series.around));
    let mut verdict = series.verdict(time);
    let second = series.second_term(condition.watch, time);
    verdict.unless(second < SECOND_BELOW, || format!("a second term would shift it by {}", percent(second)));
    verdict.doubt(second);
    let around = Around {
        hold: series.around,
        lag: view.lag(series.layer),
        time,
        decays: libm::log(amplitude / remaining),
        watched: view.watches_others(condition.watch, series.layer),
    };
    around.judge(&mut verdict);
    let at_the_face = series.around * series.biot;
    verdict.unless(at_the_face < AT_THE_FACE_BELOW || series.around <= 0.0, || {
        "what the layers around hold bends the profile".to_owned()
    });
    verdict.object(view.begins_low(condition.watch));
    Some(verdict.found(NAME, FORMULA, Gives::Time(time)))
}

impl<'a> Series<'a> {
    fn new(view: &'a View<'a>, condition: &Condition) -> Option<Self> {
        let layer = view.store();
        let fit = fit(view, layer)?;
        let chain = view.chain(None);
        let towards = view.settles[layer];
        if (view.start[layer].mean - towards).abs() < NOTHING_DECAYS {
            return None;
        }
        let (film, radiates_at) = film(view, layer, fit, &chain, condition);
        let biot = biot(film, fit.length, view.conductivities[layer]);
        let term = OneTerm::new(fit.body, biot);
        let amplitudes = amplitudes(&view.layout, layer, fit, &chain, &term, film);
        let mut series = Self {
            view,
            layer,
            fit,
            chain,
            term,
            biot,
            radiates_at,
            towards,
            amplitudes,
            around: 0.0,
            gain: 1.0,
        };
        series.count_others();
        Some(series)
    }

    /// Counts what the other layers store and begin with.
    fn count_others(&mut self) {
        let (view, layout) = (self.view, &self.view.layout);
        let difference = view.start[self.layer].mean - self.towards;
        let first_term = self.term.coefficient;
        let own = view.capacity(self.layer) * self.term.mean() / first_term;
        let (mut squares, mut begins) = (0.0, 0.0);
        for layer in (0..layout.spans.len()).filter(|&layer| layer != self.layer) {
            let (first, last) = layout.nodes[layer];
            let (a, b) = (self.amplitudes[first] / first_term, self.amplitudes[last] / first_term);
            let above = (view.start[layer].mean - view.settles[layer]) / difference;
            squares += view.capacity(layer) * (a * a + a * b + b * b) / 3.0;
            begins += view.capacity(layer) * 0.5 * (a + b) * above;
        }
        let own_squares = own / first_term;
        self.around = squares / (own_squares + squares);
        self.gain = (own + begins) / (own_squares + squares) / first_term;
    }

    /// Fourier number at a time.
    fn fourier(&self, time: f64) -> f64 {
        let layout = &self.view.layout;
        let capacity = self.view.capacity(self.layer) / layout.volume(self.layer);
        let diffusivity = diffusivity(self.view.conductivities[self.layer], capacity);
        fourier(diffusivity, time, self.fit.length)
    }

    /// Where the watched quantity begins by the first term, and where the limit lies, both against the
    /// difference between start and surroundings.
    fn asked(&self, condition: &Condition, difference: f64) -> (f64, f64) {
        let limit = condition.limit;
        let amplitude = self.gain * self.amplitude(condition.watch, difference > 0.0);
        let remaining = match condition.watch {
            Watch::Rate(_) => {
                let decay = self.term.root * self.term.root * self.fourier(1.0) * (1.0 - self.around);
                limit / (difference.abs() * decay)
            }
            Watch::Difference(_) => limit / difference.abs(),
            Watch::Hottest(_) | Watch::Coldest(_) | Watch::Mean(_) | Watch::Place(_) | Watch::Face(_) => {
                (limit - self.towards) / difference
            }
        };
        (amplitude, remaining)
    }

    fn amplitude(&self, watch: Watch, cools: bool) -> f64 {
        match watch {
            Watch::Hottest(region) if cools => self.extremes(region).1,
            Watch::Hottest(region) => self.extremes(region).0,
            Watch::Coldest(region) if cools => self.extremes(region).0,
            Watch::Coldest(region) => self.extremes(region).1,
            Watch::Mean(region) | Watch::Rate(region) => self.mean_over(region),
            Watch::Difference(region) => self.extremes(region).1 - self.extremes(region).0,
            Watch::Place(place) if self.view.layout.layer_at(place) == self.layer => {
                self.term.at(self.place_in(place))
            }
            Watch::Place(_) | Watch::Face(Side::Inner | Side::Outer) => {
                self.view.layout.watched(watch, &self.amplitudes).unwrap_or(0.0)
            }
        }
    }

    /// Where a place inside the layer lies, 0 where it is still, 1 at the face.
    fn place_in(&self, place: f64) -> f64 {
        let (from, to) = self.view.layout.spans[self.layer];
        let radius = (self.view.item().shape().inner_radius() + place).clamp(from, to);
        let from_still = if self.fit.both {
            (radius - 0.5 * (from + to)).abs()
        } else if self.fit.side == 0 {
            to - radius
        } else {
            radius - from
        };
        from_still / self.fit.length
    }

    /// How far the time is off for want of the second term.
    fn second_term(&self, watch: Watch, time: f64) -> f64 {
        let cools = self.view.start[self.layer].mean > self.towards;
        let place = match watch {
            Watch::Place(place) if self.view.layout.layer_at(place) == self.layer => self.place_in(place),
            Watch::Hottest(_) if cools => 0.0,
            Watch::Coldest(_) if !cools => 0.0,
            Watch::Mean(Region::Layer(_)) | Watch::Rate(Region::Layer(_)) | Watch::Difference(_) => 0.0,
            Watch::Mean(Region::Whole) | Watch::Rate(Region::Whole) if self.view.start.len() == 1 => 0.0,
            Watch::Hottest(_)
            | Watch::Coldest(_)
            | Watch::Mean(_)
            | Watch::Rate(_)
            | Watch::Place(_)
            | Watch::Face(_) => 1.0,
        };
        // At a held face there is nothing left to compare.
        let place = if self.biot.is_finite() { place } else { place.min(0.9) };
        let second = OneTerm::second(self.fit.body, self.biot);
        self.term.doubt(&second, place, self.fourier(time))
    }

    fn mean_over(&self, region: Region) -> f64 {
        let layout = &self.view.layout;
        layout.mean_over(region, |layer| {
            if layer == self.layer { self.term.mean() } else { layout.mean(layer, &self.amplitudes) }
        })
    }

    /// Least and most that remains anywhere in a region.
    fn extremes(&self, region: Region) -> (f64, f64) {
        let layout = &self.view.layout;
        let layers = layout.region(region);
        let centre = layers.contains(&self.layer).then(|| self.term.at(0.0));
        let nodes = layout.nodes[layers.start].0..=layout.nodes[layers.end - 1].1;
        let all = self.amplitudes[nodes].iter().copied().chain(centre);
        all.fold((f64::INFINITY, 0.0), |(least, most), a| (least.min(a), most.max(a)))
    }

    fn verdict(&self, time: f64) -> Verdict {
        let mut verdict = Verdict::new();
        if time.is_finite() {
            let number = self.fourier(time);
            let than = if number > ONE_TERM_ABOVE { "above" } else { "not above" };
            let words = format!("Fourier number {}, {than} {ONE_TERM_ABOVE}", figure(number));
            verdict.say(number > ONE_TERM_ABOVE, words);
        }
        verdict.mention(Some(format!("Biot number {}", figure(self.biot))));
        let flat = "a thin hollow layer, taken as flat";
        verdict.mention(self.fit.flat.then(|| flat.to_owned()));
        self.constancy(&mut verdict);
        let span = (self.view.start[self.layer].mean - self.towards).abs();
        verdict.object(surroundings::not_counted(self.view.item(), time, span));
        verdict
    }

    /// What the formula takes as constant and even.
    fn constancy(&self, verdict: &mut Verdict) {
        let (view, layer) = (self.view, self.layer);
        for (what, varies) in [
            ("conductivity", view.conductivity_varies(layer)),
            ("heat capacity", view.capacity_varies(layer)),
        ] {
            verdict.unless(varies < VARIES_BELOW, || format!("its {what} varies by {}", percent(varies)));
            verdict.doubt(0.2 * varies);
        }
        let varies = view.resistance_varies(&self.chain, layer);
        verdict.unless(varies < VARIES_BELOW, || {
            format!("the resistance around it varies by {}", percent(varies))
        });
        verdict.doubt(0.1 * varies);
        if let Some(face) = self.radiates_at {
            let change = self.film_changes();
            let words = format!("radiation as at a face of {}", words::temperature(face));
            verdict.say(change < RADIATION_BELOW, words);
            verdict.doubt(0.2 * change);
        }
        let start = view.start[layer];
        let uneven = start.spread / (start.mean - self.towards).abs();
        verdict.unless(uneven < UNEVEN_BELOW, || "the start is not uniform: its mean is counted".to_owned());
    }

    /// How much what passes the film changes for radiation, as a part of it.
    fn film_changes(&self) -> f64 {
        let (first, last) = self.view.layout.nodes[self.layer];
        let node = if self.fit.side == 0 { first } else { last };
        let at = |temperature: f64| self.chain.conductances(node, temperature)[self.fit.side];
        let (early, late) = (at(self.view.start[self.layer].mean), at(self.towards));
        // The weaker the film, the more it decides.
        (early - late).abs() / (0.5 * (early + late)) / (1.0 + self.biot / 3.0)
    }
}
