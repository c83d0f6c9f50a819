//! The file to a [`Scenario`]: all problems at once, each with its place.

use super::at::At;
use super::limits as limit;
use super::types::{
    Scenario, VERSION, WrittenCondition, WrittenItem, WrittenProbe, WrittenProfilePoint, WrittenShape,
    WrittenStart, WrittenSteadyBefore, WrittenWhat,
};
use super::{json, read_faces, read_layers};
use crate::problem::{Problem, Trouble, together};
use std::cell::RefCell;

pub(super) const SCENARIO: &[&str] = &[
    "stillheat",
    "title",
    "notes",
    "stopped_at",
    "look_ahead_s",
    "item",
    "start",
    "surroundings",
    "probes",
    "ready_when",
    "must_not",
];
pub(super) const ITEM: &[&str] = &["shape", "inner_radius_m", "layers"];
pub(super) const START: &[&str] = &["uniform_c", "per_layer_c", "profile", "steady_before"];
pub(super) const PROFILE_POINT: &[&str] = &["from_inside_m", "temperature_c"];
pub(super) const STEADY_BEFORE: &[&str] = &["contents_c", "inner", "outer"];
pub(super) const PROBE: &[&str] = &["name", "from_inside_m", "from_outside_m"];
pub(super) const CONDITION: &[&str] = &["what", "of", "below_c", "above_c", "below_k", "below_k_per_h"];
pub(super) const CONDITION_LIMITS: &[&str] = &["below_c", "above_c", "below_k", "below_k_per_h"];

/// Reads a scenario.
///
/// # Errors
/// Everything that is wrong with the text, each with its place; one problem may hide another inside it.
pub fn read(text: &str) -> Result<Scenario, Vec<Problem>> {
    match attempt(text) {
        (Some(scenario), problems) if problems.is_empty() => Ok(scenario),
        (_, problems) => Err(together(problems, Vec::new())),
    }
}

/// What can be read, and what is wrong with it. Where something is, the scenario is good for finding what else
/// is wrong and for nothing more: what could not be read is left out, and a layer of unknown thickness has no end.
pub fn attempt(text: &str) -> (Option<Scenario>, Vec<Problem>) {
    let (value, repeated) = match json::parse(text) {
        Ok(read) => read,
        Err(problem) => return (None, vec![problem]),
    };
    let problems = RefCell::new(repeated);
    let scenario = scenario(&At::top(&value, &problems));
    (scenario, problems.into_inner())
}

fn scenario(at: &At<'_>) -> Option<Scenario> {
    // A newer file may have other keys: its version is said, and nothing about them.
    if at.is_object() && !version_is_known(at) {
        return None;
    }
    let fields = at.fields("an object with the key \"stillheat\"", SCENARIO)?;
    let item = fields.needed("item", "the shape and its layers").and_then(|at| item(&at));
    let start = fields.needed("start", "the temperatures at time zero").and_then(|at| start(&at));
    let surroundings =
        fields.needed("surroundings", "what the faces see").and_then(|at| read_faces::surroundings(&at));
    let list = |key, what, most| fields.get(key).and_then(|at| at.list(what, 0, most)).unwrap_or_default();
    Some(Scenario {
        stillheat: VERSION,
        title: fields.get("title").and_then(|at| at.line(limit::TITLE_LETTERS)),
        notes: fields.get("notes").and_then(|at| at.text(limit::NOTES_LETTERS)),
        stopped_at: fields.get("stopped_at").and_then(|at| at.line(limit::NAME_LETTERS)),
        look_ahead_s: fields.get("look_ahead_s").and_then(|at| at.number(&limit::LOOK_AHEAD)),
        start: start.unwrap_or_default(),
        surroundings: surroundings.unwrap_or_default(),
        probes: fields.get("probes").map(|at| probes(&at)).unwrap_or_default(),
        ready_when: list("ready_when", "conditions", limit::CONDITIONS).iter().map(condition).collect(),
        must_not: list("must_not", "limits", limit::CONDITIONS).iter().map(condition).collect(),
        item: item?,
    })
}

fn version_is_known(at: &At<'_>) -> bool {
    if !at.has("stillheat") {
        at.problem(Trouble::Missing { what: "\"stillheat\": 1 says that this is a scenario".to_owned() });
        return false;
    }
    let Some(version) = at.member("stillheat") else { return false };
    match version.whole() {
        Some(VERSION) => true,
        Some(found) if found > VERSION => {
            version.problem(Trouble::NewerVersion { found });
            false
        }
        Some(found) => {
            let words = format!("version {found} never existed; the first is 1");
            version.problem(Trouble::Contradiction { words });
            false
        }
        None => false,
    }
}

/// All, or none where one could not be read.
fn all<T>(list: Vec<Option<T>>) -> Option<Vec<T>> {
    list.into_iter().collect()
}

fn item(at: &At<'_>) -> Option<WrittenItem> {
    let fields = at.fields("an object with shape and layers", ITEM)?;
    let shapes = [
        ("slab", WrittenShape::Slab),
        ("cylinder", WrittenShape::Cylinder),
        ("sphere", WrittenShape::Sphere),
    ];
    let shape = fields.needed("shape", "slab, cylinder or sphere").and_then(|at| at.word(&shapes));
    let layers = fields
        .needed("layers", "the layers from the inside out")
        .and_then(|at| at.list("layers", 1, limit::LAYERS))
        .map(|list| list.iter().map(read_layers::layer).collect());
    // One that cannot be read still says that there is a hollow inside.
    let inner_radius_m =
        fields.get("inner_radius_m").map(|at| at.number(&limit::INNER_RADIUS).unwrap_or(f64::INFINITY));
    Some(WrittenItem { shape: shape?, inner_radius_m, layers: layers? })
}

fn start(at: &At<'_>) -> Option<WrittenStart> {
    let fields = at.fields("an object that says how it starts", START)?;
    let given: Vec<&str> = START.iter().copied().filter(|key| at.has(key)).collect();
    if given.len() != 1 {
        let words = if given.is_empty() {
            format!("nothing says how it starts; one of {}", START.join(", "))
        } else {
            format!("{} are both given; only one way of starting can hold", given.join(" and "))
        };
        at.problem(Trouble::Contradiction { words });
        return None;
    }
    let temperatures = |at: At<'_>| {
        let list = at.list("temperatures", 1, limit::LAYERS)?;
        all(list.iter().map(|at| at.spread(&limit::TEMPERATURE)).collect())
    };
    let points =
        |at: At<'_>| all(at.list("points", 1, limit::PROPERTY_POINTS)?.iter().map(profile_point).collect());
    let start = WrittenStart {
        uniform_c: fields.get("uniform_c").and_then(|at| at.spread(&limit::TEMPERATURE)),
        per_layer_c: fields.get("per_layer_c").and_then(temperatures),
        profile: fields.get("profile").and_then(points),
        steady_before: fields.get("steady_before").and_then(|at| steady_before(&at)),
    };
    let read = start.uniform_c.is_some()
        || start.per_layer_c.is_some()
        || start.profile.is_some()
        || start.steady_before.is_some();
    read.then_some(start)
}

fn profile_point(at: &At<'_>) -> Option<WrittenProfilePoint> {
    let fields = at.fields("a point of the profile", PROFILE_POINT)?;
    let from_inside_m =
        fields.needed("from_inside_m", "where the point is").and_then(|at| at.number(&limit::DISTANCE));
    let temperature_c =
        fields.needed("temperature_c", "how hot it is there").and_then(|at| at.number(&limit::TEMPERATURE));
    Some(WrittenProfilePoint { from_inside_m: from_inside_m?, temperature_c: temperature_c? })
}

fn steady_before(at: &At<'_>) -> Option<WrittenSteadyBefore> {
    let fields = at.fields("the earlier surroundings", STEADY_BEFORE)?;
    let contents_c = fields.get("contents_c").and_then(|at| at.spread(&limit::TEMPERATURE));
    let inner = fields.get("inner").map(|at| read_faces::earlier_face(&at));
    let outer = fields.needed("outer", "what the outer face saw").map(|at| read_faces::earlier_face(&at));
    if at.has("contents_c") && at.has("inner") {
        let words =
            "contents_c and inner are both given; what keeps the contents hot can be only one".to_owned();
        at.problem(Trouble::Contradiction { words });
    }
    Some(WrittenSteadyBefore { contents_c, inner, outer: outer.unwrap_or_default() })
}

/// A list that cannot be read may hold any probe: it counts as one without a name.
fn probes(at: &At<'_>) -> Vec<WrittenProbe> {
    let any = WrittenProbe { name: String::new(), from_inside_m: None, from_outside_m: None };
    at.list("probes", 0, limit::PROBES).map_or_else(|| vec![any], |list| list.iter().map(probe).collect())
}

/// One that cannot be read has no name.
fn probe(at: &At<'_>) -> WrittenProbe {
    let fields = at.fields("a probe", PROBE);
    let get = |key| fields.as_ref()?.get(key);
    let name = fields.as_ref().and_then(|fields| fields.needed("name", "what the probe is called"));
    let distance = |key| get(key).and_then(|at| at.number(&limit::DISTANCE));
    if at.is_object() && at.has("from_inside_m") == at.has("from_outside_m") {
        let words = "exactly one of from_inside_m and from_outside_m says where the probe is".to_owned();
        at.problem(Trouble::Contradiction { words });
    }
    WrittenProbe {
        name: name.and_then(|at| at.name(limit::NAME_LETTERS)).unwrap_or_default(),
        from_inside_m: distance("from_inside_m"),
        from_outside_m: distance("from_outside_m"),
    }
}

/// One that cannot be read asks for nothing.
fn condition(at: &At<'_>) -> WrittenCondition {
    let nothing = WrittenCondition {
        what: WrittenWhat::Mean,
        of: None,
        below_c: None,
        above_c: None,
        below_k: None,
        below_k_per_h: None,
    };
    let Some(fields) = at.fields("a condition", CONDITION) else { return nothing };
    let whats = [
        ("hottest", WrittenWhat::Hottest),
        ("coldest", WrittenWhat::Coldest),
        ("mean", WrittenWhat::Mean),
        ("probe", WrittenWhat::Probe),
        ("face", WrittenWhat::Face),
        ("difference", WrittenWhat::Difference),
        ("rate", WrittenWhat::Rate),
    ];
    let what = fields.needed("what", "what is watched").and_then(|at| at.word(&whats));
    let of = fields.get("of").map(|at| at.line(limit::NAME_LETTERS));
    let limits: Vec<&str> = CONDITION_LIMITS.iter().copied().filter(|key| at.has(key)).collect();
    if limits.len() != 1 {
        let words = if limits.is_empty() {
            format!("no limit is given; one of {}", CONDITION_LIMITS.join(", "))
        } else {
            format!("{} are both given; a condition has one limit", limits.join(" and "))
        };
        at.problem(Trouble::Contradiction { words });
    }
    let number = |key, limit| fields.get(key).and_then(|at| at.spread(limit));
    let condition = WrittenCondition {
        of: of.clone().flatten(),
        below_c: number("below_c", &limit::TEMPERATURE),
        above_c: number("above_c", &limit::TEMPERATURE),
        below_k: number("below_k", &limit::DIFFERENCE),
        below_k_per_h: number("below_k_per_h", &limit::RATE),
        ..nothing.clone()
    };
    match (what, of) {
        (Some(what), None | Some(Some(_))) => WrittenCondition { what, ..condition },
        _ => nothing,
    }
}
