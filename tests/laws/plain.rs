//! A plain scenario, in which every condition is reached: hot throughout, cold and unchanging outside.

use crate::dice::{Dice, few_digits};
use serde_json::{Value, json};

/// A scenario that can be changed in ways that tell what must become of its answers.
#[derive(Debug)]
pub struct Plain {
    /// The file.
    pub file: Value,
}

/// Draws a scenario.
pub fn plain(rolls: &[f64]) -> Plain {
    let dice = &mut Dice::new(rolls);
    let shape = ["slab", "cylinder", "sphere"][dice.below(3) as usize];
    let count = 1 + dice.below(3) as usize;
    let layers: Vec<Value> = (0..count).map(|i| layer(dice, i)).collect();
    let thickness: f64 = layers.iter().filter_map(|layer| layer["thickness_m"].as_f64()).sum();
    let mut item = json!({"shape": shape, "layers": layers});
    if shape != "slab" && dice.chance(0.3) {
        item["inner_radius_m"] = json!(dice.scale(0.01, 1.0));
    }
    let cold = dice.between(-20.0, 60.0);
    let hot = few_digits(cold + dice.scale(20.0, 700.0));
    let below = |share: f64| few_digits(cold + share * (hot - cold));
    let mut outer = json!({"temperature_c": cold, "film_w_per_m2_k": dice.scale(3.0, 500.0)});
    if dice.chance(0.4) {
        outer["emissivity"] = json!(dice.between(0.1, 0.9));
    }
    let file = json!({
        "stillheat": 1,
        // Long enough for the slowest of them.
        "look_ahead_s": 3e8,
        "item": item,
        "start": {"uniform_c": hot},
        "surroundings": {"outer": [outer]},
        "probes": [{"name": "p", "from_inside_m": few_digits(thickness * dice.between(0.0, 0.9))}],
        "ready_when": [
            {"what": "hottest", "below_c": below(dice.between(0.1, 0.9))},
            {"what": "mean", "below_c": below(dice.between(0.1, 0.9))},
            {"what": "probe", "of": "p", "below_c": below(dice.between(0.1, 0.9))},
        ],
    });
    Plain { file }
}

fn layer(dice: &mut Dice, i: usize) -> Value {
    let mut layer = json!({
        "name": format!("layer {i}"),
        "thickness_m": dice.scale(0.002, 0.15),
        "density_kg_per_m3": dice.scale(50.0, 4000.0),
        "heat_capacity_j_per_kg_k": dice.scale(400.0, 4200.0),
        "conductivity_w_per_m_k": dice.scale(0.05, 100.0),
    });
    if i > 0 && dice.chance(0.3) {
        layer["contact_m2_k_per_w"] = json!(dice.scale(1e-4, 0.05));
    }
    if i > 0 && dice.chance(0.1) {
        layer["motion"] = json!("stirred");
        layer["inside_film_w_per_m2_k"] = json!(dice.scale(20.0, 2000.0));
    }
    layer
}

/// Multiplies a number of the file where it stands there.
fn multiply(object: &mut Value, key: &str, factor: f64) {
    if let Some(value) = object.get(key).and_then(Value::as_f64) {
        object[key] = json!(value * factor);
    }
}

fn layers(file: &mut Value) -> impl Iterator<Item = &mut Value> {
    file["item"]["layers"].as_array_mut().into_iter().flatten()
}

impl Plain {
    /// With this much of its film.
    pub fn with_film(&self, factor: f64) -> Value {
        let mut file = self.file.clone();
        multiply(&mut file["surroundings"]["outer"][0], "film_w_per_m2_k", factor);
        file
    }

    /// With factors on heat capacities, conductivities, lengths, and on everything that passes a surface.
    pub fn scaled(&self, capacity: f64, conductivity: f64, length: f64, film: f64) -> Value {
        let mut file = self.file.clone();
        for layer in layers(&mut file) {
            multiply(layer, "heat_capacity_j_per_kg_k", capacity);
            multiply(layer, "conductivity_w_per_m_k", conductivity);
            multiply(layer, "thickness_m", length);
            multiply(layer, "inside_film_w_per_m2_k", film);
            multiply(layer, "contact_m2_k_per_w", 1.0 / film);
        }
        multiply(&mut file["item"], "inner_radius_m", length);
        multiply(&mut file["probes"][0], "from_inside_m", length);
        multiply(&mut file["surroundings"]["outer"][0], "film_w_per_m2_k", film);
        multiply(&mut file["surroundings"]["outer"][0], "emissivity", film);
        file
    }

    /// With its first layer written as two of the same material.
    pub fn with_first_layer_split(&self) -> Value {
        let mut file = self.file.clone();
        if let Some(layers) = file["item"]["layers"].as_array_mut() {
            let mut piece = layers[0].clone();
            multiply(&mut piece, "thickness_m", 0.5);
            layers[0] = piece.clone();
            piece["name"] = json!("other piece");
            layers.insert(1, piece);
        }
        file
    }

    /// A slab with its inside outside.
    pub fn turned(&self) -> Value {
        let mut file = self.file.clone();
        let mut contact = Value::Null;
        if let Some(layers) = file["item"]["layers"].as_array_mut() {
            // A contact belongs to the layer outside it, so it moves by one.
            for layer in layers.iter_mut().rev() {
                let own = layer["contact_m2_k_per_w"].take();
                layer["contact_m2_k_per_w"] = std::mem::replace(&mut contact, own);
            }
            layers.reverse();
            for layer in layers {
                if layer["contact_m2_k_per_w"].is_null()
                    && let Some(fields) = layer.as_object_mut()
                {
                    fields.remove("contact_m2_k_per_w");
                }
            }
        }
        let outer = file["surroundings"]["outer"].take();
        file["surroundings"] = json!({"inner": outer});
        let place = file["probes"][0]["from_inside_m"].take();
        file["probes"] = json!([{"name": "p", "from_outside_m": place}]);
        file
    }
}
