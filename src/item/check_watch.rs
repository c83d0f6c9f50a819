//! Probes and conditions: what is watched, and where.

use super::{Condition, Probe, Region, Sense, Shape, Side, Watch};
use crate::problem::{Problem, Trouble, figure, rounded};
use crate::scenario::{Number, WrittenCondition, WrittenProbe, WrittenWhat, nearest};
use crate::units::kelvin;

const SECONDS_PER_HOUR: f64 = 3_600.0;
/// The word for all layers together.
pub(super) const WHOLE: &str = "item";

/// What conditions may refer to.
pub(super) struct Places<'a> {
    /// Names of the layers, in order.
    pub layers: &'a [String],
    pub probes: &'a [Probe],
    pub shape: Shape,
}

pub(super) fn probes(written: &[WrittenProbe], thickness: f64, problems: &mut Vec<Problem>) -> Vec<Probe> {
    let mut all: Vec<Probe> = Vec::new();
    for (number, probe) in written.iter().enumerate() {
        let path = format!("/probes/{number}");
        let (key, distance) = match (probe.from_inside_m, probe.from_outside_m) {
            (Some(distance), _) => ("from_inside_m", distance),
            (None, outside) => ("from_outside_m", outside.unwrap_or(0.0)),
        };
        if distance > thickness * (1.0 + 1e-9) {
            let (distance, thickness) = (figure(distance), rounded(thickness));
            let words = format!("{distance} m is outside the item, which is {thickness} m thick");
            problems.push(Problem::error(format!("{path}/{key}"), Trouble::Contradiction { words }));
        }
        if !probe.name.is_empty() && all.iter().any(|other| other.name == probe.name) {
            let words = format!("two probes are called \"{}\"", probe.name);
            problems.push(Problem::error(format!("{path}/name"), Trouble::Contradiction { words }));
        }
        let from_inside = if key == "from_inside_m" { distance } else { thickness - distance };
        all.push(Probe { name: probe.name.clone(), from_inside: from_inside.max(0.0).min(thickness) });
    }
    all
}

pub(super) fn conditions(
    written: &[WrittenCondition],
    path: &str,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<Vec<Condition>> {
    let one = |(number, written)| condition(written, format!("{path}/{number}"), places, problems);
    let all: Vec<Option<Condition>> = written.iter().enumerate().map(one).collect();
    all.into_iter().collect()
}

fn condition(
    written: &WrittenCondition,
    path: String,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<Condition> {
    let watch = watch(written, &path, places, problems);
    let limit = limit(written, &path, problems);
    let (watch, subject) = watch?;
    let (sense, limit) = limit?;
    Some(Condition { watch, sense, limit, subject, path })
}

/// The limit in SI; its key must fit what is watched.
fn limit(written: &WrittenCondition, path: &str, problems: &mut Vec<Problem>) -> Option<(Sense, f64)> {
    let WrittenCondition { below_c, above_c, below_k, below_k_per_h, .. } = written;
    let value = |number: &Number| number.value();
    let (key, expected) = match written.what {
        WrittenWhat::Difference => {
            if let Some(limit) = below_k {
                return Some((Sense::Below, value(limit)));
            }
            ("difference", "below_k")
        }
        WrittenWhat::Rate => {
            if let Some(limit) = below_k_per_h {
                return Some((Sense::Below, value(limit) / SECONDS_PER_HOUR));
            }
            ("rate", "below_k_per_h")
        }
        WrittenWhat::Hottest
        | WrittenWhat::Coldest
        | WrittenWhat::Mean
        | WrittenWhat::Probe
        | WrittenWhat::Face => {
            if let Some(limit) = below_c {
                return Some((Sense::Below, kelvin(value(limit))));
            }
            if let Some(limit) = above_c {
                return Some((Sense::Above, kelvin(value(limit))));
            }
            ("temperature", "below_c or above_c")
        }
    };
    let words = format!("the limit of a {key} is given by {expected}");
    problems.push(Problem::error(path, Trouble::Contradiction { words }));
    None
}

/// What is watched, and its words.
fn watch(
    written: &WrittenCondition,
    path: &str,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<(Watch, String)> {
    let of = written.of.as_deref();
    let path = format!("{path}/of");
    match written.what {
        WrittenWhat::Probe => probe(of, path, places, problems),
        WrittenWhat::Face => face(of, path, places, problems),
        WrittenWhat::Hottest
        | WrittenWhat::Coldest
        | WrittenWhat::Mean
        | WrittenWhat::Difference
        | WrittenWhat::Rate => {
            let (region, name) = region(of, path, places, problems)?;
            Some(match written.what {
                WrittenWhat::Coldest => (Watch::Coldest(region), format!("coldest of {name}")),
                WrittenWhat::Mean => (Watch::Mean(region), format!("mean of {name}")),
                WrittenWhat::Difference => {
                    (Watch::Difference(region), format!("hottest minus coldest of {name}"))
                }
                WrittenWhat::Rate => (Watch::Rate(region), format!("change of the mean of {name}")),
                WrittenWhat::Hottest | WrittenWhat::Probe | WrittenWhat::Face => {
                    (Watch::Hottest(region), format!("hottest of {name}"))
                }
            })
        }
    }
}

fn region(
    of: Option<&str>,
    path: String,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<(Region, String)> {
    let Some(of) = of.filter(|of| *of != WHOLE) else {
        return Some((Region::Whole, "the whole item".to_owned()));
    };
    let mut named = places.layers.iter().enumerate().filter(|(_, name)| *name == of);
    match (named.next(), named.next()) {
        (Some((number, name)), None) => Some((Region::Layer(number), name.clone())),
        (Some(_), Some(_)) => {
            let words = format!("two layers are called \"{of}\"; give them different names");
            problems.push(Problem::error(path, Trouble::Contradiction { words }));
            None
        }
        (None, _) => {
            let names = places.layers.iter().map(String::as_str).chain([WHOLE]);
            problems.push(Problem::error(path, unknown(of, names.collect())));
            None
        }
    }
}

fn probe(
    of: Option<&str>,
    path: String,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<(Watch, String)> {
    let found = places.probes.iter().find(|probe| Some(probe.name.as_str()) == of);
    if found.is_none() {
        let names: Vec<&str> = places.probes.iter().map(|probe| probe.name.as_str()).collect();
        // The one that is meant may be the one whose name could not be read.
        if names.contains(&"") {
            return None;
        }
        let trouble = match of {
            _ if names.is_empty() => {
                Trouble::Missing { what: "no probe exists; add one to /probes".to_owned() }
            }
            None => Trouble::Missing { what: format!("which probe: {}", names.join(", ")) },
            Some(of) => unknown(of, names),
        };
        problems.push(Problem::error(path, trouble));
    }
    found.map(|probe| (Watch::Place(probe.from_inside), format!("probe {}", probe.name)))
}

fn face(
    of: Option<&str>,
    path: String,
    places: &Places<'_>,
    problems: &mut Vec<Problem>,
) -> Option<(Watch, String)> {
    match of {
        Some("outer") => Some((Watch::Face(Side::Outer), "outer face".to_owned())),
        Some("inner") if places.shape.has_inner_face() => {
            Some((Watch::Face(Side::Inner), "inner face".to_owned()))
        }
        Some("inner") => {
            let words = "a solid has no inner face; watch the hottest or coldest, or a probe".to_owned();
            problems.push(Problem::error(path, Trouble::Contradiction { words }));
            None
        }
        Some(other) => {
            problems.push(Problem::error(path, unknown(other, vec!["inner", "outer"])));
            None
        }
        None => {
            let what = "which face: inner or outer".to_owned();
            problems.push(Problem::error(path, Trouble::Missing { what }));
            None
        }
    }
}

fn unknown(found: &str, known: Vec<&str>) -> Trouble {
    Trouble::NotOneOf {
        found: found.to_owned(),
        nearest: nearest(found, known.iter().copied()).map(str::to_owned),
        allowed: known.into_iter().map(str::to_owned).collect(),
    }
}
