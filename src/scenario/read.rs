//! The file to a [`Scenario`]: all problems at once, each with its place.

use super::at::At;
use super::limits as limit;
use super::types::{
    Number, Scenario, VERSION, WrittenCondition, WrittenItem, WrittenLayer, WrittenMotion, WrittenProbe,
    WrittenProfilePoint, WrittenProperty, WrittenShape, WrittenStart, WrittenSteadyBefore, WrittenWhat,
};
use super::{json, read_faces};
use crate::problem::{Limit, Problem, Trouble};
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
pub(super) const LAYER: &[&str] = &[
    "name",
    "material",
    "thickness_m",
    "density_kg_per_m3",
    "heat_capacity_j_per_kg_k",
    "conductivity_w_per_m_k",
    "motion",
    "inside_film_w_per_m2_k",
    "contact_m2_k_per_w",
];
pub(super) const PROPERTY_TABLE: &[&str] = &["at_c", "values"];
pub(super) const PROPERTY_POLYNOMIAL: &[&str] = &["polynomial_in_c", "from_c", "to_c"];
pub(super) const START: &[&str] = &["uniform_c", "per_layer_c", "profile", "steady_before"];
pub(super) const PROFILE_POINT: &[&str] = &["from_inside_m", "temperature_c"];
pub(super) const STEADY_BEFORE: &[&str] = &["contents_c", "inner", "outer"];
pub(super) const PROBE: &[&str] = &["name", "from_inside_m", "from_outside_m"];
pub(super) const CONDITION: &[&str] = &["what", "of", "below_c", "above_c", "below_k", "below_k_per_h"];

/// Reads a scenario.
///
/// # Errors
/// Everything that is wrong with the text, each with its place; one problem may hide another inside it.
pub fn read(text: &str) -> Result<Scenario, Vec<Problem>> {
    let value = json::parse(text)?;
    let problems = RefCell::new(Vec::new());
    let scenario = scenario(&At::top(&value, &problems));
    let problems = problems.into_inner();
    match scenario {
        Some(scenario) if problems.is_empty() => Ok(scenario),
        _ => Err(problems),
    }
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
    let conditions = |key, what| match fields.get(key) {
        Some(at) => all(at.list(what, 0, limit::CONDITIONS)?.iter().map(condition).collect()),
        None => Some(Vec::new()),
    };
    let ready_when = conditions("ready_when", "conditions");
    let must_not = conditions("must_not", "limits");
    let probes = match fields.get("probes") {
        Some(at) => {
            at.list("probes", 0, limit::PROBES).and_then(|list| all(list.iter().map(probe).collect()))
        }
        None => Some(Vec::new()),
    };
    Some(Scenario {
        stillheat: VERSION,
        title: fields.get("title").and_then(|at| at.text(limit::TITLE_LETTERS)),
        notes: fields.get("notes").and_then(|at| at.text(limit::NOTES_LETTERS)),
        stopped_at: fields.get("stopped_at").and_then(|at| at.text(limit::NAME_LETTERS)),
        look_ahead_s: fields.get("look_ahead_s").and_then(|at| at.number(&limit::LOOK_AHEAD)),
        item: item?,
        start: start?,
        surroundings: surroundings?,
        probes: probes?,
        ready_when: ready_when?,
        must_not: must_not?,
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
        .and_then(|list| all(list.iter().map(layer).collect()));
    let inner_radius_m = fields.get("inner_radius_m").and_then(|at| at.number(&limit::INNER_RADIUS));
    Some(WrittenItem { shape: shape?, inner_radius_m, layers: layers? })
}

fn layer(at: &At<'_>) -> Option<WrittenLayer> {
    let fields = at.fields("an object that describes a layer", LAYER)?;
    let motions = [
        ("still", WrittenMotion::Still),
        ("self-mixing", WrittenMotion::SelfMixing),
        ("stirred", WrittenMotion::Stirred),
    ];
    let thickness =
        fields.needed("thickness_m", "how thick the layer is").and_then(|at| at.spread(&limit::THICKNESS));
    let property = |key, limit: &'static Limit| fields.get(key).and_then(|at| property(&at, limit));
    let layer = WrittenLayer {
        name: fields.get("name").and_then(|at| at.text(limit::NAME_LETTERS)),
        material: fields.get("material").and_then(|at| at.text(limit::NAME_LETTERS)),
        thickness_m: Number::Plain(0.0),
        density_kg_per_m3: property("density_kg_per_m3", &limit::DENSITY),
        heat_capacity_j_per_kg_k: property("heat_capacity_j_per_kg_k", &limit::HEAT_CAPACITY),
        conductivity_w_per_m_k: property("conductivity_w_per_m_k", &limit::CONDUCTIVITY),
        motion: fields.get("motion").and_then(|at| at.word(&motions)),
        inside_film_w_per_m2_k: fields.get("inside_film_w_per_m2_k").and_then(|at| at.spread(&limit::FILM)),
        contact_m2_k_per_w: fields.get("contact_m2_k_per_w").and_then(|at| at.spread(&limit::CONTACT)),
    };
    Some(WrittenLayer { thickness_m: thickness?, ..layer })
}

fn property(at: &At<'_>, limits: &'static Limit) -> Option<WrittenProperty> {
    if at.has("at_c") || at.has("values") {
        let fields = at.fields("a table", PROPERTY_TABLE)?;
        let at_c = fields
            .needed("at_c", "the temperatures of the table")
            .and_then(|at| at.ascending("temperatures", 2, limit::PROPERTY_POINTS, &limit::TEMPERATURE));
        let values = fields
            .needed("values", "a value for each temperature")
            .and_then(|at| at.numbers("values", 2, limit::PROPERTY_POINTS, limits));
        let (at_c, values) = (at_c?, values?);
        return at
            .same_length("at_c", at_c.len(), "values", values.len())
            .then_some(WrittenProperty::Table { at_c, values });
    }
    if at.has("polynomial_in_c") || at.has("from_c") || at.has("to_c") {
        let fields = at.fields("a polynomial", PROPERTY_POLYNOMIAL)?;
        let polynomial_in_c = fields
            .needed("polynomial_in_c", "the coefficients from the constant up")
            .and_then(|at| at.numbers("coefficients", 1, limit::COEFFICIENTS, &limit::COEFFICIENT));
        let from_c =
            fields.needed("from_c", "where its range begins").and_then(|at| at.number(&limit::TEMPERATURE));
        let to_c =
            fields.needed("to_c", "where its range ends").and_then(|at| at.number(&limit::TEMPERATURE));
        let (polynomial_in_c, from_c, to_c) = (polynomial_in_c?, from_c?, to_c?);
        if from_c >= to_c {
            let words = format!("from_c {from_c} is not below to_c {to_c}");
            at.problem(Trouble::Contradiction { words });
            return None;
        }
        return Some(WrittenProperty::Polynomial { polynomial_in_c, from_c, to_c });
    }
    at.spread(limits).map(WrittenProperty::Number)
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
    let inner = fields.get("inner").and_then(|at| read_faces::face(&at));
    let outer = fields.needed("outer", "what the outer face saw").and_then(|at| read_faces::face(&at));
    if at.has("contents_c") && at.has("inner") {
        let words =
            "contents_c and inner are both given; what keeps the contents hot can be only one".to_owned();
        at.problem(Trouble::Contradiction { words });
    }
    Some(WrittenSteadyBefore { contents_c, inner, outer: outer? })
}

fn probe(at: &At<'_>) -> Option<WrittenProbe> {
    let fields = at.fields("a probe", PROBE)?;
    let name = fields.needed("name", "what the probe is called").and_then(|at| at.text(limit::NAME_LETTERS));
    let distance = |key| fields.get(key).and_then(|at| at.number(&limit::DISTANCE));
    let (from_inside_m, from_outside_m) = (distance("from_inside_m"), distance("from_outside_m"));
    if at.has("from_inside_m") == at.has("from_outside_m") {
        let words = "exactly one of from_inside_m and from_outside_m says where the probe is".to_owned();
        at.problem(Trouble::Contradiction { words });
        return None;
    }
    Some(WrittenProbe { name: name?, from_inside_m, from_outside_m })
}

fn condition(at: &At<'_>) -> Option<WrittenCondition> {
    let fields = at.fields("a condition", CONDITION)?;
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
    let limits: Vec<&str> = CONDITION[2..].iter().copied().filter(|key| at.has(key)).collect();
    if limits.len() != 1 {
        let words = if limits.is_empty() {
            format!("no limit is given; one of {}", CONDITION[2..].join(", "))
        } else {
            format!("{} are both given; a condition has one limit", limits.join(" and "))
        };
        at.problem(Trouble::Contradiction { words });
    }
    let number = |key, limit| fields.get(key).and_then(|at| at.spread(limit));
    Some(WrittenCondition {
        what: what?,
        of: fields.get("of").and_then(|at| at.text(limit::NAME_LETTERS)),
        below_c: number("below_c", &limit::TEMPERATURE),
        above_c: number("above_c", &limit::TEMPERATURE),
        below_k: number("below_k", &limit::DIFFERENCE),
        below_k_per_h: number("below_k_per_h", &limit::RATE),
    })
}
