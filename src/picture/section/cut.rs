//! Along the cut: where each layer lies on the picture, and the temperatures along it.

use super::super::colour::Colour;
use super::super::layers::{LayerColumns, sides};
use super::super::palette::Inks;

/// A layer thinner than this on the picture is drawn this thick, px: two pixels of it stay free between the
/// lines on its sides.
const LEAST: f64 = 3.0;

/// Colours are mixed straight between stops; stops this far apart on the ramp keep to it.
const RAMP_STEP: f64 = 1.0 / 16.0;

/// Stops nearer than this cannot be told apart, px.
const STOP_GAP: f64 = 0.6;

/// The layers along the cut, from the inside out.
#[derive(Clone, Debug, PartialEq)]
pub struct Cut {
    /// Where each layer begins and where the last one ends, px from the centre (round) or the inner face (slab).
    pub at: Vec<f64>,
    /// Which layers are drawn thicker than to scale.
    pub widened: Vec<bool>,
    /// (px; temperature), ascending; twice the same px is a jump.
    course: Vec<(f64, f64)>,
}

impl Cut {
    /// Layers drawn from `begin` to `end`, px.
    pub fn new(layers: &[LayerColumns], begin: f64, end: f64) -> Self {
        let thicknesses: Vec<f64> = layers.iter().map(|layer| layer.thickness).collect();
        let (drawn, widened) = drawn(&thicknesses, end - begin);
        let mut at = vec![begin];
        for px in &drawn {
            at.push(at[at.len() - 1] + px);
        }
        let mut course = Vec::new();
        for (number, (layer, side)) in layers.iter().zip(sides(layers)).enumerate() {
            let scale = drawn[number] / layer.thickness;
            let points: Vec<(f64, f64)> =
                layer.points(side).map(|(place, t)| (at[number] + (place - side) * scale, t)).collect();
            add_course(&mut course, &points, at[number], at[number + 1]);
        }
        Self { at, widened, course }
    }

    /// Colour stops along the cut, by px.
    pub fn stops(&self, inks: &Inks, scale: (f64, f64)) -> Vec<(f64, Colour)> {
        let ramp = |t: f64| (t - scale.0) / (scale.1 - scale.0);
        let mut stops: Vec<(f64, Colour)> = Vec::new();
        let mut before: Option<(f64, f64)> = None;
        for &(px, t) in &self.course {
            if let Some((from, cold)) = before
                && px > from
            {
                let between = ((ramp(t) - ramp(cold)).abs() / RAMP_STEP).ceil().min(64.0);
                let mut i = 1.0;
                while i < between {
                    let part = i / between;
                    stops.push((from + (px - from) * part, inks.ramp(ramp(cold + (t - cold) * part))));
                    i += 1.0;
                }
            }
            stops.push((px, inks.ramp(ramp(t))));
            before = Some((px, t));
        }
        stops
    }

    /// Where the temperature passes `value` inside a layer, px.
    pub fn passes(&self, value: f64) -> Vec<f64> {
        let crossed = |pair: &[(f64, f64)]| {
            let ((from, a), (to, b)) = (pair[0], pair[1]);
            let passes = to > from && (a - value) * (b - value) < 0.0;
            passes.then(|| from + (to - from) * (value - a) / (b - a))
        };
        self.course.windows(2).filter_map(crossed).collect()
    }
}

/// One layer's temperatures, held to its sides, without points that fall onto each other.
fn add_course(course: &mut Vec<(f64, f64)>, points: &[(f64, f64)], begin: f64, end: f64) {
    let (Some(&(_, first)), Some(&(_, last))) = (points.first(), points.last()) else { return };
    course.push((begin, first));
    let mut reached = begin;
    for &(px, t) in points {
        if px - reached >= STOP_GAP && end - px >= STOP_GAP {
            course.push((px, t));
            reached = px;
        }
    }
    course.push((end, last));
}

/// Thicknesses to px so that they add up to `room`: to scale, but none thinner than [`LEAST`] where that is
/// possible; and which had to be widened.
fn drawn(thicknesses: &[f64], room: f64) -> (Vec<f64>, Vec<bool>) {
    let mut widened = vec![false; thicknesses.len()];
    let least = LEAST.min(room / thicknesses.len().max(1) as f64);
    loop {
        let rest: f64 = thicknesses.iter().zip(&widened).filter(|(_, wide)| !**wide).map(|(t, _)| t).sum();
        let taken = widened.iter().filter(|wide| **wide).count() as f64 * least;
        let scale = if rest > 0.0 { (room - taken) / rest } else { 0.0 };
        let mut settled = true;
        for (t, wide) in thicknesses.iter().zip(&mut widened) {
            if !*wide && t * scale < least * (1.0 - 1e-9) {
                *wide = true;
                settled = false;
            }
        }
        if settled {
            let px = |(t, wide): (&f64, &bool)| if *wide { least } else { t * scale };
            return (thicknesses.iter().zip(&widened).map(px).collect(), widened);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::super::super::palette::Theme;
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn layers_are_to_scale_and_thin_ones_stay_visible() {
        let (px, widened) = drawn(&[0.4, 0.004, 0.1], 252.0);
        assert_eq!(widened, [false, true, false]);
        assert_relative_eq!(px[1], 3.0);
        assert_relative_eq!(px[0] / px[2], 4.0, max_relative = 1e-12);
        assert_relative_eq!(px.iter().sum::<f64>(), 252.0, max_relative = 1e-12);
        assert_eq!(drawn(&[0.4, 0.1], 100.0), (vec![80.0, 20.0], vec![false, false]));
    }

    #[test]
    fn many_thin_layers_share_the_room() {
        let mut thicknesses = vec![1e-4; 19];
        thicknesses.push(1.0);
        let (px, widened) = drawn(&thicknesses, 100.0);
        assert_eq!(widened.iter().filter(|wide| **wide).count(), 19);
        assert_relative_eq!(px.iter().sum::<f64>(), 100.0, max_relative = 1e-12);
        let (px, _) = drawn(&[1.0; 20], 20.0);
        assert!(px.iter().all(|px| (px - 1.0).abs() < 1e-12));
    }

    #[test]
    fn a_contact_is_a_jump_and_an_isotherm_lies_inside_a_layer() {
        let layer = |places, temperatures| LayerColumns {
            name: "a",
            thickness: 1.0,
            thickness_words: "1 m",
            places,
            temperatures,
        };
        let cut =
            Cut::new(&[layer(&[0.0, 1.0], &[90.0, 70.0]), layer(&[1.0, 2.0], &[50.0, 30.0])], 0.0, 200.0);
        assert_eq!(cut.passes(80.0), [50.0]);
        assert_eq!(cut.passes(60.0), [] as [f64; 0]);
        let stops = cut.stops(Theme::Light.inks(), (20.0, 100.0));
        let jump: Vec<_> = stops.iter().filter(|(px, _)| (px - 100.0).abs() < 1e-9).collect();
        assert!(jump.len() == 2 && jump[0].1 != jump[1].1);
    }
}
