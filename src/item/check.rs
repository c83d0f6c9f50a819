//! From what is written to what can be solved: SI, kelvin, and every rule that joins two fields.

use super::check_faces::{face_programme, one_face};
use super::check_layers::layers;
use super::check_watch::{Places, conditions, probes};
use super::{Item, Programme, Shape, Side, Start};
use crate::matter::library::Material;
use crate::problem::{Problem, Severity, Trouble, figure, rounded};
use crate::scenario::limits::{PLACE_STEP, apart};
use crate::scenario::{Number, Scenario, WrittenShape, WrittenStart, WrittenSteadyBefore};
use crate::units::clock::Clock;
use crate::units::kelvin;

/// How far to look ahead where the file does not say, s: 90 days.
pub const LOOK_AHEAD: f64 = 90.0 * 86_400.0;

/// A scenario that can be solved, and what is unusual about it.
#[derive(Clone, Debug)]
pub struct Checked {
    /// What can be solved.
    pub item: Item,
    /// Allowed, but unusual.
    pub warnings: Vec<Problem>,
    /// The wall clock at time zero.
    pub clock: Option<Clock>,
    /// What the question is called.
    pub title: String,
    /// The liquids among the layers that are said to be still, with what they are made of.
    pub still_liquids: Vec<(usize, Material)>,
}

impl Item {
    /// Checks a scenario and brings it to SI.
    ///
    /// # Errors
    /// Everything that cannot be solved, each with its place.
    pub fn check(scenario: &Scenario) -> Result<Checked, Vec<Problem>> {
        let mut problems = Vec::new();
        let checked = check(scenario, &mut problems);
        let (errors, warnings): (Vec<_>, Vec<_>) =
            problems.into_iter().partition(|problem| problem.severity == Severity::Error);
        match checked {
            Some(checked) if errors.is_empty() => Ok(Checked { warnings, ..checked }),
            _ => Err(errors),
        }
    }
}

fn check(scenario: &Scenario, problems: &mut Vec<Problem>) -> Option<Checked> {
    let shape = shape(scenario, problems);
    let clock = clock(scenario, problems);
    let layers = layers(&scenario.item.layers, problems);
    if shape.inner_radius() == 0.0 && !scenario.surroundings.inner.is_empty() && shape != Shape::Slab {
        let words = "a solid has no inner face; give it an inner_radius_m, or leave this out".to_owned();
        problems.push(Problem::error("/surroundings/inner", Trouble::Contradiction { words }));
    }
    let inner = face_programme(&scenario.surroundings.inner, "/surroundings/inner", problems);
    let outer = face_programme(&scenario.surroundings.outer, "/surroundings/outer", problems);
    let thickness: f64 = scenario.item.layers.iter().map(|layer| layer.thickness_m.value()).sum();
    let start = start(scenario, shape, thickness, problems);
    let probes = probes(&scenario.probes, thickness, problems);
    let places = Places { layers: &layers.names, probes: &probes, shape };
    let ready_when = conditions(&scenario.ready_when, "/ready_when", &places, problems);
    let must_not = conditions(&scenario.must_not, "/must_not", &places, problems);
    let item = Item {
        shape,
        inner: inner?,
        outer: outer?,
        start: start?,
        probes,
        ready_when: ready_when?,
        must_not: must_not?,
        look_ahead: scenario.look_ahead_s.unwrap_or(LOOK_AHEAD),
        layers: layers.all?,
    };
    super::unusual::warn(&item, &layers.materials, problems);
    Some(Checked {
        item,
        warnings: Vec::new(),
        clock,
        title: scenario.title.clone().unwrap_or_default(),
        still_liquids: layers.still_liquids,
    })
}

fn shape(scenario: &Scenario, problems: &mut Vec<Problem>) -> Shape {
    let inner_radius = scenario.item.inner_radius_m.unwrap_or(0.0);
    match scenario.item.shape {
        WrittenShape::Slab => {
            if inner_radius > 0.0 {
                let words =
                    "a slab has no inner radius; leave it out, or choose cylinder or sphere".to_owned();
                problems.push(Problem::error("/item/inner_radius_m", Trouble::Contradiction { words }));
            }
            Shape::Slab
        }
        WrittenShape::Cylinder => Shape::Cylinder { inner_radius },
        WrittenShape::Sphere => Shape::Sphere { inner_radius },
    }
}

fn clock(scenario: &Scenario, problems: &mut Vec<Problem>) -> Option<Clock> {
    let written = scenario.stopped_at.as_ref()?;
    let clock = Clock::parse(written);
    if clock.is_none() {
        let words = format!("\"{written}\" is no date and time; written as 2026-03-01T06:00");
        problems.push(Problem::error("/stopped_at", Trouble::Contradiction { words }));
    }
    clock
}

fn start(scenario: &Scenario, shape: Shape, thickness: f64, problems: &mut Vec<Problem>) -> Option<Start> {
    let temperature = |number: &Number| kelvin(number.value());
    let WrittenStart { uniform_c, per_layer_c, profile, steady_before } = &scenario.start;
    if let Some(uniform) = uniform_c {
        return Some(Start::Uniform(temperature(uniform)));
    }
    if let Some(all) = per_layer_c {
        let layers = scenario.item.layers.len();
        if all.len() != layers {
            let words = format!("{} temperatures for {layers} layers; each layer needs its own", all.len());
            problems.push(Problem::error("/start/per_layer_c", Trouble::Contradiction { words }));
            return None;
        }
        return Some(Start::PerLayer(all.iter().map(temperature).collect()));
    }
    if let Some(points) = profile {
        let mut sound = true;
        for (i, point) in points.iter().enumerate() {
            let path = format!("/start/profile/{i}/from_inside_m");
            let at = figure(point.from_inside_m);
            let words = if point.from_inside_m > thickness * (1.0 + 1e-9) {
                format!("{at} m is outside the item, which is {} m thick", rounded(thickness))
            } else if i > 0 && !apart(points[i - 1].from_inside_m, point.from_inside_m, PLACE_STEP) {
                let before = figure(points[i - 1].from_inside_m);
                format!("{at} m does not come after {before} m by at least {PLACE_STEP} m")
            } else {
                continue;
            };
            problems.push(Problem::error(path, Trouble::Contradiction { words }));
            sound = false;
        }
        let points = points.iter().map(|point| (point.from_inside_m, kelvin(point.temperature_c)));
        return sound.then(|| Start::Profile(points.collect()));
    }
    steady_before.as_ref().and_then(|before| steady(before, shape, problems))
}

fn steady(before: &WrittenSteadyBefore, shape: Shape, problems: &mut Vec<Problem>) -> Option<Start> {
    let path = "/start/steady_before";
    let inner = match &before.inner {
        Some(_) if !shape.has_inner_face() => {
            let words =
                "a solid has no inner face; say what its contents were kept at (contents_c)".to_owned();
            problems.push(Problem::error(format!("{path}/inner"), Trouble::Contradiction { words }));
            return None;
        }
        Some(face) => one_face(face, 0.0, &format!("{path}/inner"), problems)?,
        None => super::Face::Insulated,
    };
    let outer = one_face(&before.outer, 0.0, &format!("{path}/outer"), problems)?;
    let contents = before.contents_c.map(|number| kelvin(number.value()));
    let fixes = |face: &super::Face| matches!(face, super::Face::Held(_) | super::Face::Exchange { .. });
    if contents.is_none() && !fixes(&inner) && !fixes(&outer) {
        let words =
            "nothing fixes a temperature, so no steady state exists; give contents_c, a held face or \
                     surroundings with a film"
                .to_owned();
        problems.push(Problem::error(path, Trouble::Contradiction { words }));
        return None;
    }
    Some(Start::SteadyBefore { contents, inner, outer })
}

impl Programme {
    /// Insulated for ever.
    pub(super) fn insulated() -> Self {
        Self { rows: vec![(0.0, super::Face::Insulated)] }
    }
}

impl Side {
    /// The word of the file.
    pub fn word(self) -> &'static str {
        match self {
            Self::Inner => "inner",
            Self::Outer => "outer",
        }
    }
}
