//! From an answer to the columns of numbers that the pictures show.

mod course;

use super::section::{Hollow, Outline, Section};
use super::{LayerColumns, Picture, Profile};
use crate::Solved;
use crate::item::Shape;
use crate::units::display::length_words;
use crate::units::quantity::System;
use crate::units::words;

/// From here on a weekday says too little, s: a day less than a week.
const WEEK: f64 = 6.0 * 86_400.0;

/// An answer, ready to be shown in some units.
pub struct Shown<'a> {
    solved: &'a Solved,
    system: System,
    /// Coldest and hottest of the whole course, in the unit shown.
    extent: (f64, f64),
}

/// A layer at one moment, in the units shown.
struct Layer {
    name: String,
    thickness: f64,
    words: String,
    places: Vec<f64>,
    temperatures: Vec<f64>,
}

impl<'a> Shown<'a> {
    /// Looks through the whole course once.
    pub fn new(solved: &'a Solved, system: System) -> Self {
        let history = &solved.resolved.fine.history;
        let mut extent = (f64::INFINITY, f64::NEG_INFINITY);
        for time in [0.0].iter().chain(history.times()) {
            for kelvin in history.temperatures(*time) {
                let shown = system.temperature(kelvin);
                extent = (extent.0.min(shown), extent.1.max(shown));
            }
        }
        Self { solved, system, extent }
    }

    /// End of what can be shown, s.
    pub fn end(&self) -> f64 {
        self.solved.resolved.fine.history.end()
    }

    /// Makes one of the pictures at a moment, s, and hands it on; an unknown name makes none.
    pub fn picture(&self, name: &str, time: f64, then: &mut dyn FnMut(&dyn Picture)) {
        match name {
            "section" => self.section(time, then),
            "curve" => self.curve(time, then),
            "profile" => self.profile(time, then),
            _ => {}
        }
    }

    fn section(&self, time: f64, then: &mut dyn FnMut(&dyn Picture)) {
        let layers = self.layers(time);
        let shape = self.solved.checked.item.shape();
        let radius = length_words(shape.inner_radius(), self.system);
        let hollow = shape
            .has_inner_face()
            .then_some(Hollow { radius: self.system.length(shape.inner_radius()), words: &radius });
        let outline = match shape {
            Shape::Slab => Outline::Slab,
            Shape::Cylinder { .. } => Outline::Cylinder { hollow },
            Shape::Sphere { .. } => Outline::Sphere { hollow },
        };
        then(&Section {
            outline,
            layers: &columns(&layers),
            scale: self.extent,
            unit: self.system.temperature_unit(),
            when: &self.short_words(time),
        });
    }

    fn profile(&self, time: f64, then: &mut dyn FnMut(&dyn Picture)) {
        let (now, start) = (self.layers(time), if time > 0.0 { self.layers(0.0) } else { Vec::new() });
        let from = match self.solved.checked.item.shape() {
            Shape::Cylinder { inner_radius } if inner_radius <= 0.0 => "the axis",
            Shape::Sphere { inner_radius } if inner_radius <= 0.0 => "the centre",
            Shape::Slab | Shape::Cylinder { .. } | Shape::Sphere { .. } => "the inner face",
        };
        then(&Profile {
            layers: &columns(&now),
            start: &columns(&start),
            scale: self.extent,
            unit: self.system.temperature_unit(),
            places: &format!("{} from {from}", self.system.length_unit()),
            when: &self.short_words(time),
        });
    }

    /// The layers at a moment.
    fn layers(&self, time: f64) -> Vec<Layer> {
        let history = &self.solved.resolved.fine.history;
        let temperatures = history.temperatures(time);
        let layers = self.solved.checked.item.layers().iter().zip(&history.mesh().layers);
        let one = |(layer, &(first, last)): (&crate::item::Layer, &(usize, usize))| Layer {
            name: layer.name.clone(),
            thickness: self.system.length(layer.thickness),
            words: length_words(layer.thickness, self.system),
            places: history.places()[first..=last].iter().map(|place| self.system.length(*place)).collect(),
            temperatures: temperatures[first..=last].iter().map(|t| self.system.temperature(*t)).collect(),
        };
        layers.map(one).collect()
    }

    /// The moment in words: "Tuesday 14:20, 2 days 8 h after the stop".
    pub fn moment_words(&self, time: f64) -> String {
        let after = format!("{} after the stop", words::duration(time));
        match self.solved.checked.clock.and_then(|clock| clock.after(time)) {
            Some(then) => format!("{}, {after}", then.weekday_time()),
            None => after,
        }
    }

    /// The moment in few words: "Tue 14:20", over more than a week "Tue 3 Mar 14:20"; or "8 h 20 min" where the
    /// stop has no date.
    fn short_words(&self, time: f64) -> String {
        match self.solved.checked.clock.and_then(|clock| clock.after(time)) {
            Some(then) if self.end() > WEEK => {
                format!("{} {} {}", &then.short()[..3], then.day(), then.hour_minute())
            }
            Some(then) => then.short(),
            None => words::duration(time),
        }
    }
}

impl Layer {
    fn columns(&self) -> LayerColumns<'_> {
        LayerColumns {
            name: &self.name,
            thickness: self.thickness,
            thickness_words: &self.words,
            places: &self.places,
            temperatures: &self.temperatures,
        }
    }
}

fn columns(layers: &[Layer]) -> Vec<LayerColumns<'_>> {
    layers.iter().map(Layer::columns).collect()
}
