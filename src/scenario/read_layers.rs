//! Layers and their material properties, as written.

use super::at::{At, SPREAD};
use super::limits as limit;
use super::types::{Number, WrittenLayer, WrittenMotion, WrittenProperty};
use crate::problem::{Limit, Trouble, figure};

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

/// One that cannot be read has no end and no properties.
pub(super) fn layer(at: &At<'_>) -> WrittenLayer {
    let fields = at.fields("an object that describes a layer", LAYER);
    let get = |key| fields.as_ref()?.get(key);
    let motions = [
        ("still", WrittenMotion::Still),
        ("self-mixing", WrittenMotion::SelfMixing),
        ("stirred", WrittenMotion::Stirred),
    ];
    let thickness = fields.as_ref().and_then(|fields| fields.needed("thickness_m", "how thick the layer is"));
    let property = |key, limit: &'static Limit| get(key).and_then(|at| property(&at, limit));
    let motion = get("motion").map(|at| at.word(&motions));
    let film = get("inside_film_w_per_m2_k").and_then(|at| at.spread(&limit::FILM));
    WrittenLayer {
        name: get("name").and_then(|at| at.line(limit::NAME_LETTERS)),
        material: get("material").map(|at| at.line(limit::NAME_LETTERS).unwrap_or_default()),
        thickness_m: thickness
            .and_then(|at| at.spread(&limit::THICKNESS))
            .unwrap_or(Number::Plain(f64::INFINITY)),
        density_kg_per_m3: property("density_kg_per_m3", &limit::DENSITY),
        heat_capacity_j_per_kg_k: property("heat_capacity_j_per_kg_k", &limit::HEAT_CAPACITY),
        conductivity_w_per_m_k: property("conductivity_w_per_m_k", &limit::CONDUCTIVITY),
        motion: motion.flatten(),
        // Whether a motion that could not be read needs a film is not known.
        inside_film_w_per_m2_k: film.filter(|_| motion != Some(None)),
        contact_m2_k_per_w: get("contact_m2_k_per_w").and_then(|at| at.spread(&limit::CONTACT)),
    }
}

fn property(at: &At<'_>, limits: &'static Limit) -> Option<WrittenProperty> {
    if at.has("at_c") || at.has("values") {
        let fields = at.fields("a table", PROPERTY_TABLE)?;
        let at_c = fields.needed("at_c", "the temperatures of the table").and_then(|at| {
            let (most, step) = (limit::PROPERTY_POINTS, limit::TEMPERATURE_STEP);
            at.ascending("temperatures", most, &limit::TEMPERATURE, step)
        });
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
        if !limit::apart(from_c, to_c, limit::TEMPERATURE_STEP) {
            let (from_c, to_c) = (figure(from_c), figure(to_c));
            let words =
                format!("from_c {from_c} is not below to_c {to_c} by at least {}", limit::TEMPERATURE_STEP);
            at.problem(Trouble::Contradiction { words });
            return None;
        }
        return Some(WrittenProperty::Polynomial { polynomial_in_c, from_c, to_c });
    }
    if at.is_object() && !SPREAD.iter().any(|key| at.has(key)) {
        let [table, polynomial] = [PROPERTY_TABLE, PROPERTY_POLYNOMIAL].map(|keys| keys.join(", "));
        let words = format!(
            "an object here is a number (value, low, high), a table ({table}) or a polynomial ({polynomial})"
        );
        at.problem(Trouble::Contradiction { words });
        return None;
    }
    at.spread(limits).map(WrittenProperty::Number)
}
