//! From an answer to the columns of numbers that the pictures show.

use super::curve::{Curve, CurveLine};
use super::profile::{Profile, ProfileLayer};
use super::section::{Outline, Section, SectionLayer};
use super::table::Table;
use crate::Solved;
use crate::answer::Outcome;
use crate::item::{Condition, Region, Sense, Shape, Side, Watch};
use crate::units::display::length_words;
use crate::units::quantity::System;
use crate::units::words;

/// Times at which curves are read.
const POINTS: usize = 160;
/// Rows of their table, less one.
const ROWS: usize = 16;

/// An answer, ready to be shown in some units.
pub struct Shown<'a> {
    solved: &'a Solved,
    system: System,
    /// Coldest and hottest of the whole course, in the unit shown.
    extent: (f64, f64),
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

    /// Temperatures of all nodes at a moment, in the unit shown.
    pub fn temperatures(&self, time: f64) -> Vec<f64> {
        let kelvin = self.solved.resolved.fine.history.temperatures(time);
        kelvin.into_iter().map(|kelvin| self.system.temperature(kelvin)).collect()
    }

    /// The item cut open; `temperatures` are those of the moment.
    pub fn section<'t>(&self, temperatures: &'t [f64]) -> Section<'t> {
        let item = &self.solved.checked.item;
        let history = &self.solved.resolved.fine.history;
        let inner = item.shape().inner_radius();
        let mut from = inner;
        let layers = item.layers().iter().zip(&history.mesh().layers).map(|(layer, nodes)| {
            let edges = (from, from + layer.thickness);
            from = edges.1;
            let thickness = length_words(layer.thickness, self.system);
            SectionLayer { name: layer.name.clone(), thickness, nodes: *nodes, edges }
        });
        Section {
            outline: if item.shape() == Shape::Slab { Outline::Flat } else { Outline::Round },
            layers: layers.collect(),
            places: history.places().iter().map(|place| inner + place).collect(),
            temperatures,
            unit: self.system.temperature_unit(),
            extent: self.extent,
        }
    }

    /// Temperatures through the layers.
    pub fn profile<'t>(&self, now: &'t [f64], start: &'t [f64]) -> Profile<'t> {
        let item = &self.solved.checked.item;
        let history = &self.solved.resolved.fine.history;
        let mut from = 0.0;
        let layers = item.layers().iter().zip(&history.mesh().layers).map(|(layer, nodes)| {
            let edges = (from, from + layer.thickness);
            from = edges.1;
            let shown = (self.system.length(edges.0), self.system.length(edges.1));
            ProfileLayer { name: layer.name.clone(), nodes: *nodes, edges: shown }
        });
        Profile {
            layers: layers.collect(),
            places: history.places().iter().map(|place| self.system.length(*place)).collect(),
            now,
            start,
            unit: self.system.temperature_unit(),
            length_unit: self.system.length_unit(),
            extent: self.extent,
        }
    }

    /// What is watched, over time.
    pub fn curve(&self, cursor: Option<f64>) -> Curve {
        self.curve_of(POINTS, cursor)
    }

    fn curve_of(&self, points: usize, cursor: Option<f64>) -> Curve {
        let end = self.end();
        // Denser at first, where most happens.
        let times: Vec<f64> = (0..=points)
            .map(|i| {
                let part = i as f64 / points as f64;
                end * part * (0.15 + 0.85 * part)
            })
            .collect();
        let watched = self.watched();
        let watches: Vec<Watch> = watched.iter().map(|line| line.1).collect();
        let courses = self.solved.resolved.fine.history.courses(&watches, &times);
        let lines = watched.into_iter().zip(courses).map(|((name, _), course)| CurveLine {
            name,
            values: course.into_iter().map(|kelvin| self.system.temperature(kelvin)).collect(),
        });
        Curve {
            lines: lines.collect(),
            limits: self.limits(),
            marks: self.marks(),
            cursor,
            clock: self.solved.checked.clock,
            unit: self.system.temperature_unit(),
            times,
        }
    }

    fn conditions(&self) -> impl Iterator<Item = &Condition> {
        let item = &self.solved.checked.item;
        item.ready_when().iter().chain(item.must_not())
    }

    /// Lines of the curve: what conditions watch, and the hottest and the outer face where that is little.
    fn watched(&self) -> Vec<(String, Watch)> {
        let mut all: Vec<(String, Watch)> = Vec::new();
        let mut add = |name: String, watch: Watch| {
            if all.len() < 4 && !all.iter().any(|other| other.1 == watch) {
                all.push((name, watch));
            }
        };
        for condition in self.conditions() {
            if is_temperature(condition.watch) {
                add(condition.subject.clone(), condition.watch);
            }
        }
        for probe in self.solved.checked.item.probes() {
            add(probe.name.clone(), Watch::Place(probe.from_inside));
        }
        if all.len() < 2 {
            let mut add = |name: &str, watch| {
                if !all.iter().any(|other: &(String, Watch)| other.1 == watch) {
                    all.push((name.to_owned(), watch));
                }
            };
            add("hottest", Watch::Hottest(Region::Whole));
            add("outer face", Watch::Face(Side::Outer));
        }
        all
    }

    fn limits(&self) -> Vec<(f64, String)> {
        let temperatures = self.conditions().filter(|condition| is_temperature(condition.watch));
        let mut all: Vec<(f64, String)> = Vec::new();
        for condition in temperatures {
            let side = match condition.sense {
                Sense::Below => "below",
                Sense::Above => "above",
            };
            let value = self.system.temperature(condition.limit);
            let words =
                format!("{} {side} {}", condition.subject, self.system.temperature_words(condition.limit));
            if !all.iter().any(|other| (other.0 - value).abs() < 1e-9) {
                all.push((value, words));
            }
        }
        all
    }

    fn marks(&self) -> Vec<(f64, String)> {
        let mut all = Vec::new();
        let report = &self.solved.report;
        for (outcome, word) in [(&report.ready, "ready"), (&report.standing, "limit")] {
            if let Some(Outcome::At { time_s, .. }) = outcome
                && *time_s <= self.end()
            {
                let when = match self.solved.checked.clock.and_then(|clock| clock.after(*time_s)) {
                    Some(then) => then.short(),
                    None => words::duration(*time_s),
                };
                all.push((*time_s, format!("{word} {when}")));
            }
        }
        all
    }

    /// The moment in words: "Tuesday 14:20, 2 days 8 h after the stop".
    pub fn moment_words(&self, time: f64) -> String {
        let after = format!("{} after the stop", words::duration(time));
        match self.solved.checked.clock.and_then(|clock| clock.after(time)) {
            Some(then) => format!("{}, {after}", then.weekday_time()),
            None => after,
        }
    }

    /// The numbers of a section or a profile at a moment.
    pub fn places_table(&self, time: f64, caption: &str) -> Table {
        let now = self.temperatures(time);
        let section = self.section(&now);
        let rows = section.layers.iter().map(|layer| {
            let nodes = &now[layer.nodes.0..=layer.nodes.1];
            let mean = nodes.iter().sum::<f64>() / nodes.len() as f64;
            let tenth = super::section::tenth;
            let inside = tenth(now[layer.nodes.0]);
            vec![layer.name.clone(), layer.thickness.clone(), inside, tenth(mean), tenth(now[layer.nodes.1])]
        });
        let unit = section.unit;
        Table {
            caption: format!("{caption}, {}", self.moment_words(time)),
            columns: vec![
                "layer".to_owned(),
                "thickness".to_owned(),
                format!("inside {unit}"),
                format!("about the middle {unit}"),
                format!("outside {unit}"),
            ],
            rows: rows.collect(),
        }
    }

    /// The numbers of the curve.
    pub fn curve_table(&self) -> Table {
        let curve = self.curve_of(ROWS, None);
        let mut columns = vec!["time".to_owned()];
        columns.extend(curve.lines.iter().map(|line| format!("{} {}", line.name, curve.unit)));
        let rows = (0..curve.times.len()).map(|i| {
            let mut row = vec![self.moment_words(curve.times[i])];
            row.extend(curve.lines.iter().map(|line| super::section::tenth(line.values[i])));
            row
        });
        Table { caption: "Temperatures over time".to_owned(), columns, rows: rows.collect() }
    }
}

fn is_temperature(watch: Watch) -> bool {
    !matches!(watch, Watch::Difference(_) | Watch::Rate(_))
}
