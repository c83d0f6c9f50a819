//! Layers: materials, properties, motion, contact.

use super::check_watch::WHOLE;
use super::{Layer, Motion};
use crate::matter::Law;
use crate::matter::library::{self, Material, Phase};
use crate::problem::{Limit, Problem, Trouble, quantity, rounded};
use crate::scenario::{WrittenLayer, WrittenMotion, WrittenProperty, limits, nearest};
use crate::units::kelvin;

/// A still liquid thinner than this hardly moves, m. Common practice, no source.
const THIN_LIQUID: f64 = 0.005;

/// The layers with what is known of their materials.
pub(super) struct Layers {
    /// None where one cannot be made.
    pub all: Option<Vec<Layer>>,
    /// What each is called.
    pub names: Vec<String>,
    /// The library material of each layer, if one.
    pub materials: Vec<Option<Material>>,
    pub still_liquids: Vec<(usize, Material)>,
}

pub(super) fn layers(written: &[WrittenLayer], problems: &mut Vec<Problem>) -> Layers {
    let mut all = Vec::new();
    let (mut names, mut materials, mut still_liquids) = (Vec::new(), Vec::new(), Vec::new());
    for (number, layer) in written.iter().enumerate() {
        let path = format!("/item/layers/{number}");
        let material = material(layer, &path, problems);
        let name = name(layer, number, material.as_ref(), &path, problems);
        let made = one(layer, number, &name, material.as_ref(), &path, problems);
        if let (Some(made), Some(material)) = (&made, &material)
            && material.phase == Phase::Liquid
            && made.motion == Motion::Still
            && made.thickness > THIN_LIQUID
        {
            still_liquids.push((number, material.clone()));
        }
        all.push(made.filter(|_| layer.material.is_none() || material.is_some()));
        names.push(name);
        materials.push(material);
    }
    Layers { all: all.into_iter().collect(), names, materials, still_liquids }
}

fn name(
    written: &WrittenLayer,
    number: usize,
    material: Option<&Material>,
    path: &str,
    problems: &mut Vec<Problem>,
) -> String {
    if written.name.as_deref() == Some(WHOLE) {
        let words = format!("\"{WHOLE}\" means all layers together; give the layer another name");
        problems.push(Problem::error(format!("{path}/name"), Trouble::Contradiction { words }));
    }
    layer_name(written.name.as_deref(), material.map(|material| material.name), number)
}

fn material(layer: &WrittenLayer, path: &str, problems: &mut Vec<Problem>) -> Option<Material> {
    let id = layer.material.as_ref()?;
    let found = library::material(id);
    if found.is_none() {
        let trouble = Trouble::NotOneOf {
            found: id.clone(),
            nearest: nearest(id, library::ids()).map(str::to_owned),
            allowed: library::ids().map(str::to_owned).collect(),
        };
        problems.push(Problem::error(format!("{path}/material"), trouble));
    }
    found
}

fn one(
    written: &WrittenLayer,
    number: usize,
    name: &str,
    material: Option<&Material>,
    path: &str,
    problems: &mut Vec<Problem>,
) -> Option<Layer> {
    let named = written.material.is_some();
    let mut property = |given: Option<&WrittenProperty>, key: &str, from: Option<&Law>, limit| match given {
        Some(given) => own(given, limit, &format!("{path}/{key}"), problems),
        None if from.is_none() && !named => {
            let what = "a layer without a material needs density, heat capacity and conductivity".to_owned();
            problems.push(Problem::error(format!("{path}/{key}"), Trouble::Missing { what }));
            None
        }
        None => from.cloned(),
    };
    let density = property(
        written.density_kg_per_m3.as_ref(),
        "density_kg_per_m3",
        material.map(|material| &material.density),
        &limits::DENSITY,
    );
    let heat_capacity = property(
        written.heat_capacity_j_per_kg_k.as_ref(),
        "heat_capacity_j_per_kg_k",
        material.map(|material| &material.heat_capacity),
        &limits::HEAT_CAPACITY,
    );
    let conductivity = property(
        written.conductivity_w_per_m_k.as_ref(),
        "conductivity_w_per_m_k",
        material.map(|material| &material.conductivity),
        &limits::CONDUCTIVITY,
    );
    let motion = motion(written, path, problems);
    if number == 0 && written.contact_m2_k_per_w.is_some() {
        let words = "the innermost layer has nothing inside it to be in contact with".to_owned();
        problems.push(Problem::error(format!("{path}/contact_m2_k_per_w"), Trouble::Contradiction { words }));
    }
    Some(Layer {
        name: name.to_owned(),
        thickness: written.thickness_m.value(),
        capacity: density?.times(&heat_capacity?),
        conductivity: conductivity?,
        motion: motion?,
        contact: written.contact_m2_k_per_w.map_or(0.0, crate::scenario::Number::value),
        material: material.map(|material| material.id),
    })
}

/// What a layer is called: by its own name, else its material's, else its number, which counts from 0 here.
pub fn layer_name(own: Option<&str>, material: Option<&str>, number: usize) -> String {
    let own = own.filter(|name| !name.trim().is_empty());
    own.or(material).map_or_else(|| format!("layer {}", number + 1), str::to_owned)
}

fn motion(written: &WrittenLayer, path: &str, problems: &mut Vec<Problem>) -> Option<Motion> {
    let path = format!("{path}/inside_film_w_per_m2_k");
    let words = match (written.motion.unwrap_or_default(), written.inside_film_w_per_m2_k) {
        (WrittenMotion::Still, None) => return Some(Motion::Still),
        (WrittenMotion::SelfMixing | WrittenMotion::Stirred, Some(film)) => {
            return Some(Motion::Mixed { film: film.value() });
        }
        (WrittenMotion::Still, Some(_)) => {
            "a still layer has no inside film; leave it out, or set motion to self-mixing or stirred"
                .to_owned()
        }
        (WrittenMotion::SelfMixing | WrittenMotion::Stirred, None) => {
            let what = "the film between the moving contents and the layer beside them; water by its own \
                        buoyancy has about 100 to 400";
            problems.push(Problem::error(path, Trouble::Missing { what: what.to_owned() }));
            return None;
        }
    };
    problems.push(Problem::error(path, Trouble::Contradiction { words }));
    None
}

/// The written property; wherever it goes, it stays within its limits.
fn own(written: &WrittenProperty, limit: &Limit, path: &str, problems: &mut Vec<Problem>) -> Option<Law> {
    let law = law(written);
    let (lowest, highest) = law.extent();
    let [lowest, highest] = [lowest, highest].map(rounded);
    let words = if !limit.holds(lowest) {
        format!("it falls to {} within its range; {limit}", quantity(lowest, limit.unit))
    } else if !limit.holds(highest) {
        format!("it rises to {} within its range; {limit}", quantity(highest, limit.unit))
    } else {
        return Some(law);
    };
    problems.push(Problem::error(path, Trouble::Contradiction { words }));
    None
}

fn law(written: &WrittenProperty) -> Law {
    match written {
        WrittenProperty::Number(number) => Law::Constant(number.value()),
        WrittenProperty::Table { at_c, values } => {
            let points: Vec<(f64, f64)> =
                at_c.iter().map(|&at| kelvin(at)).zip(values.iter().copied()).collect();
            Law::table(&points)
        }
        WrittenProperty::Polynomial { polynomial_in_c, from_c, to_c } => {
            Law::polynomial_about(kelvin(0.0), kelvin(*from_c), kelvin(*to_c), polynomial_in_c)
        }
    }
}
