//! Any valid scenario.

use crate::dice::{Dice, few_digits};
use serde_json::{Map, Value, json};

/// A scenario and what is known of it without solving it.
#[derive(Debug)]
pub struct Any {
    /// The file.
    pub file: Value,
    /// Lowest and highest temperature of start and surroundings, °C.
    pub extent: (f64, f64),
    /// Does a face take heat in, whatever its temperature?
    pub heated: bool,
    /// Does a face give heat off, whatever its temperature?
    pub cooled: bool,
    /// Are all properties the same at every temperature?
    pub constant: bool,
}

/// Coldest and hottest temperature drawn, °C.
const TEMPERATURES: (f64, f64) = (-40.0, 800.0);
/// Film coefficients drawn, W/(m² K).
const FILMS: (f64, f64) = (2.0, 2000.0);
/// How far a face with a given heat flux may move the far side of the item, K.
const MOVED_BY_FLUX: f64 = 100.0;
/// Periods looked ahead where something swings.
const PERIODS: f64 = 12.0;

/// What is kept while a scenario is drawn.
struct Draw<'a> {
    dice: &'a mut Dice<'a>,
    extent: (f64, f64),
    constant: bool,
    heated: bool,
    cooled: bool,
    /// A time in which much happens, s.
    slow: f64,
    /// Heat flux that moves the temperatures by [`MOVED_BY_FLUX`], W/m².
    strong_flux: f64,
    longest_period: f64,
}

/// Draws a scenario.
pub fn any(rolls: &[f64]) -> Any {
    let dice = &mut Dice::new(rolls);
    let mut draw = Draw {
        dice,
        extent: (f64::INFINITY, f64::NEG_INFINITY),
        constant: true,
        heated: false,
        cooled: false,
        slow: 0.0,
        strong_flux: 0.0,
        longest_period: 0.0,
    };
    let shape = ["slab", "cylinder", "sphere"][draw.dice.below(3) as usize];
    let hollow = (shape != "slab" && draw.dice.chance(0.4)).then(|| draw.dice.scale(0.005, 1.0));
    let count = 1 + draw.dice.below(4) as usize;
    let layers: Vec<Value> = (0..count).map(|i| draw.layer(i)).collect();
    draw.measure(&layers, hollow);

    let has_inner_face = shape == "slab" || hollow.is_some();
    let flux_at = if has_inner_face && draw.dice.chance(0.15) { 1 + draw.dice.below(2) } else { 0 };
    let mut surroundings = Map::new();
    if has_inner_face {
        surroundings.insert("inner".into(), draw.programme(is_mixed(&layers[0]), flux_at, 1));
    }
    surroundings.insert("outer".into(), draw.programme(is_mixed(&layers[count - 1]), flux_at, 2));

    let thickness: f64 = layers.iter().filter_map(|layer| layer["thickness_m"].as_f64()).sum();
    let start = draw.start(count, thickness, has_inner_face);
    let ready_when: Vec<Value> =
        (0..=draw.dice.below(2)).map(|_| draw.condition(count, has_inner_face)).collect();
    let must_not: Vec<Value> =
        (0..draw.dice.below(3)).map(|_| draw.condition(count, has_inner_face)).collect();

    let mut item = json!({"shape": shape, "layers": layers});
    if let Some(radius) = hollow {
        item["inner_radius_m"] = json!(radius);
    }
    let mut file = json!({
        "stillheat": 1,
        "item": item,
        "start": start,
        "surroundings": surroundings,
        "probes": [{"name": "p", "from_outside_m": few_digits(0.3 * thickness)}],
        "ready_when": ready_when,
    });
    if !must_not.is_empty() {
        file["must_not"] = json!(must_not);
    }
    if draw.longest_period > 0.0 {
        file["look_ahead_s"] = json!(PERIODS * draw.longest_period);
    }
    Any { file, extent: draw.extent, heated: draw.heated, cooled: draw.cooled, constant: draw.constant }
}

fn is_mixed(layer: &Value) -> bool {
    layer.get("motion").is_some()
}

impl Draw<'_> {
    /// A temperature of start or surroundings, °C.
    fn temperature(&mut self) -> f64 {
        let drawn = self.dice.between(TEMPERATURES.0, TEMPERATURES.1);
        self.note(drawn)
    }

    fn note(&mut self, temperature: f64) -> f64 {
        self.extent = (self.extent.0.min(temperature), self.extent.1.max(temperature));
        temperature
    }

    fn layer(&mut self, i: usize) -> Value {
        let mut layer = json!({
            "name": format!("layer {i}"),
            "thickness_m": self.dice.scale(0.0005, 0.5),
            "density_kg_per_m3": self.dice.scale(30.0, 8000.0),
        });
        if self.dice.chance(0.15) {
            return self.library_layer(layer);
        }
        let (heat_capacity, conductivity) = (self.dice.scale(400.0, 4200.0), self.dice.scale(0.02, 200.0));
        layer["heat_capacity_j_per_kg_k"] = self.property(heat_capacity);
        layer["conductivity_w_per_m_k"] = self.property(conductivity);
        if self.dice.chance(0.15) {
            layer["motion"] = json!(["stirred", "self-mixing"][self.dice.below(2) as usize]);
            layer["inside_film_w_per_m2_k"] = json!(self.dice.scale(20.0, 2000.0));
        }
        if i > 0 && self.dice.chance(0.3) {
            layer["contact_m2_k_per_w"] = json!(self.dice.scale(1e-4, 0.05));
        }
        layer
    }

    /// Of a material of the library, but for the density.
    fn library_layer(&mut self, mut layer: Value) -> Value {
        let ids: Vec<&str> = stillheat::matter::library::ids().collect();
        let drawn = self.dice.below(u32::try_from(ids.len()).unwrap_or(1));
        layer["material"] = json!(ids[drawn as usize]);
        self.constant = false;
        layer
    }

    /// A number, a table or a polynomial around a value.
    fn property(&mut self, around: f64) -> Value {
        match self.dice.below(6) {
            4 => {
                self.constant = false;
                let values: Vec<f64> = (0..4).map(|_| around * self.dice.between(0.6, 1.6)).collect();
                json!({"at_c": [-20, 100, 300, 700], "values": values})
            }
            5 => {
                self.constant = false;
                let slope = self.dice.between(-4e-4, 1e-3);
                json!({"polynomial_in_c": [around, around * slope], "from_c": -50, "to_c": 800})
            }
            _ => json!(around),
        }
    }

    /// How slow the item is, and what it resists.
    fn measure(&mut self, layers: &[Value], hollow: Option<f64>) {
        let at = |layer: &Value, key: &str| {
            let value = &layer[key];
            value
                .as_f64()
                .or_else(|| value["values"][0].as_f64())
                .or_else(|| value["polynomial_in_c"][0].as_f64())
        };
        let (mut capacity, mut resistance, mut thickness) = (0.0, 0.1, 0.0);
        for layer in layers {
            let length = at(layer, "thickness_m").unwrap_or(0.0);
            thickness += length;
            capacity += length
                * at(layer, "density_kg_per_m3").unwrap_or(0.0)
                * at(layer, "heat_capacity_j_per_kg_k").unwrap_or(0.0);
            resistance += length / at(layer, "conductivity_w_per_m_k").unwrap_or(1.0)
                + at(layer, "contact_m2_k_per_w").unwrap_or(0.0);
        }
        // A hollow sphere gathers the flux of its outer face on its inner one.
        let spread =
            hollow.map_or(1.0, |radius| (radius + thickness) * (radius + thickness) / (radius * radius));
        self.slow = (capacity * resistance).clamp(60.0, 8e6);
        self.strong_flux = MOVED_BY_FLUX / (resistance * spread * 2.0);
    }

    /// Rows of surroundings of face 1 (inner) or 2 (outer).
    fn programme(&mut self, mixed: bool, flux_at: u32, face: u32) -> Value {
        let mut from = 0.0;
        let rows: Vec<Value> = (0..=self.dice.below(2))
            .map(|i| {
                let mut row = if flux_at == 0 {
                    self.face(mixed)
                } else if flux_at == face {
                    self.flux()
                } else {
                    self.film()
                };
                if i > 0 {
                    from = few_digits(from + self.slow * self.dice.between(0.02, 0.5));
                    row["from_s"] = json!(from);
                }
                row
            })
            .collect();
        json!(rows)
    }

    fn face(&mut self, mixed: bool) -> Value {
        match self.dice.below(6) {
            0 | 1 => self.film(),
            2 => json!({"insulated": true}),
            3 => {
                let mut face = self.film();
                face["emissivity"] = json!(self.dice.between(0.05, 1.0));
                if self.dice.chance(0.3) {
                    face["radiation_to_c"] = self.over_time();
                }
                face
            }
            4 => {
                let temperature = self.over_time();
                json!({"temperature_c": temperature, "emissivity": self.dice.between(0.05, 1.0)})
            }
            // A mixed layer has no face of its own that could be held.
            _ if mixed => self.film(),
            _ => json!({"held_c": self.over_time()}),
        }
    }

    fn film(&mut self) -> Value {
        let temperature = self.over_time();
        json!({"temperature_c": temperature, "film_w_per_m2_k": self.dice.scale(FILMS.0, FILMS.1)})
    }

    fn flux(&mut self) -> Value {
        let flux = self.dice.between(-1.0, 1.0) * self.strong_flux;
        self.heated |= flux > 0.0;
        self.cooled |= flux < 0.0;
        json!({"heat_flux_into_w_per_m2": few_digits(flux)})
    }

    fn over_time(&mut self) -> Value {
        let slow = self.slow;
        match self.dice.below(8) {
            4 => json!({
                "from_c": self.temperature(), "to_c": self.temperature(),
                "over_s": few_digits(slow * self.dice.between(0.01, 1.0)),
            }),
            5 | 6 => {
                let step = few_digits(slow * self.dice.between(0.01, 0.2));
                let times: Vec<f64> = (0..4).map(|i| few_digits(step * f64::from(i))).collect();
                let values: Vec<f64> = (0..4).map(|_| self.temperature()).collect();
                let mut table = json!({"at_s": times, "values_c": values});
                if self.dice.chance(0.3) {
                    let period = few_digits(step * self.dice.between(3.1, 5.0));
                    self.longest_period = self.longest_period.max(period);
                    table["repeats_every_s"] = json!(period);
                }
                table
            }
            7 => {
                let period = few_digits(slow * self.dice.between(0.05, 2.0));
                self.longest_period = self.longest_period.max(period);
                let (mean, amplitude) = (self.temperature(), self.dice.between(0.0, 100.0));
                self.note(mean - amplitude);
                self.note(mean + amplitude);
                json!({
                    "mean_c": mean, "amplitude_k": amplitude, "period_s": period,
                    "highest_at_s": few_digits(period * self.dice.between(0.0, 1.0)),
                })
            }
            _ => json!(self.temperature()),
        }
    }

    fn start(&mut self, count: usize, thickness: f64, has_inner_face: bool) -> Value {
        match self.dice.below(6) {
            2 => {
                let temperatures: Vec<f64> = (0..count).map(|_| self.temperature()).collect();
                json!({"per_layer_c": temperatures})
            }
            3 => {
                let points: Vec<Value> = (0..4)
                    .map(|i| json!({"from_inside_m": thickness * f64::from(i) / 3.0, "temperature_c": self.temperature()}))
                    .collect();
                json!({"profile": points})
            }
            4 => json!({"steady_before": {"contents_c": self.temperature(), "outer": self.film()}}),
            5 if has_inner_face => json!({"steady_before": {"inner": self.film(), "outer": self.film()}}),
            _ => json!({"uniform_c": self.temperature()}),
        }
    }

    fn condition(&mut self, layers: usize, has_inner_face: bool) -> Value {
        let region = |dice: &mut Dice| match dice.below(2) {
            0 => "item".to_owned(),
            _ => format!("layer {}", dice.below(u32::try_from(layers).unwrap_or(1))),
        };
        let (low, high) = self.extent;
        let limit = few_digits(low + (high - low) * self.dice.between(0.05, 0.95));
        let side = if self.dice.chance(0.3) { "above_c" } else { "below_c" };
        match self.dice.below(8) {
            0 | 1 => json!({"what": "hottest", "of": region(self.dice), side: limit}),
            2 => json!({"what": "coldest", "of": region(self.dice), side: limit}),
            3 => json!({"what": "mean", "of": region(self.dice), side: limit}),
            4 => json!({"what": "probe", "of": "p", side: limit}),
            5 => {
                let face = if has_inner_face && self.dice.chance(0.5) { "inner" } else { "outer" };
                json!({"what": "face", "of": face, side: limit})
            }
            6 => {
                json!({"what": "difference", "of": region(self.dice), "below_k": self.dice.scale(0.5, 50.0)})
            }
            _ => {
                json!({"what": "rate", "of": region(self.dice), "below_k_per_h": self.dice.scale(0.1, 100.0)})
            }
        }
    }
}
