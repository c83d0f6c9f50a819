//! The types of the file.

use serde::Serialize;

#[cfg(not(target_arch = "wasm32"))]
use schemars::JsonSchema;

/// The format version this program writes.
pub const VERSION: u64 = 1;

/// Everything that one question needs.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Scenario {
    /// Version of the format.
    pub stillheat: u64,
    /// What the question is called.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub title: Option<String>,
    /// Anything worth keeping with it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub notes: Option<String>,
    /// Local date and time of time zero, `2026-03-01T06:00`.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub stopped_at: Option<String>,
    /// How far to look ahead, s; 90 days where it is left out.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub look_ahead_s: Option<f64>,
    /// The thing that cools or warms.
    pub item: WrittenItem,
    /// The temperatures at time zero.
    pub start: WrittenStart,
    /// What the faces see.
    pub surroundings: WrittenSurroundings,
    /// Named places whose temperature is watched.
    #[serde(skip_serializing_if = "Vec::is_empty", default)]
    pub probes: Vec<WrittenProbe>,
    /// It is ready when all of these hold.
    #[serde(skip_serializing_if = "Vec::is_empty", default)]
    pub ready_when: Vec<WrittenCondition>,
    /// It may stand until the first of these happens.
    #[serde(skip_serializing_if = "Vec::is_empty", default)]
    pub must_not: Vec<WrittenCondition>,
}

/// A number, or a number that is known only roughly.
#[derive(Clone, Copy, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(untagged)]
pub enum Number {
    /// As good as exact.
    Plain(f64),
    /// Known roughly.
    Spread {
        /// The likely value, used for the answer.
        value: f64,
        /// Hardly lower than this.
        low: f64,
        /// Hardly higher than this.
        high: f64,
    },
}

impl Number {
    /// The likely value.
    pub fn value(self) -> f64 {
        match self {
            Self::Plain(value) | Self::Spread { value, .. } => value,
        }
    }
}

/// The outline of the item across its layers.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(rename_all = "lowercase")]
pub enum WrittenShape {
    /// Flat layers; heat flows straight through them.
    Slab,
    /// Layers around an axis.
    Cylinder,
    /// Layers around a point.
    Sphere,
}

/// The thing that cools or warms: a shape and its layers from the inside out.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenItem {
    /// The outline.
    pub shape: WrittenShape,
    /// Radius of the hollow inside of a cylinder or sphere, m; left out or 0: solid.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub inner_radius_m: Option<f64>,
    /// From the inside (centre, axis, inner face) out; 1 to 20.
    pub layers: Vec<WrittenLayer>,
}

/// How the contents of a layer move.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Default, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum WrittenMotion {
    /// Not at all: solid, paste, bed. Conduction alone.
    #[default]
    Still,
    /// A liquid at rest, moved by its own buoyancy: one temperature, a film on each side.
    SelfMixing,
    /// Stirred: one temperature, a film on each side.
    Stirred,
}

/// A piece of one material. Material properties may be left to `material`, given here, or both (here wins).
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenLayer {
    /// What people call it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub name: Option<String>,
    /// Id of a material of the library.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub material: Option<String>,
    /// Thickness (of the innermost layer of a solid cylinder or sphere: its radius), m.
    pub thickness_m: Number,
    /// Density, kg/m³.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub density_kg_per_m3: Option<WrittenProperty>,
    /// Heat capacity, J/(kg K).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub heat_capacity_j_per_kg_k: Option<WrittenProperty>,
    /// Thermal conductivity, W/(m K).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub conductivity_w_per_m_k: Option<WrittenProperty>,
    /// How its contents move; still where left out.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub motion: Option<WrittenMotion>,
    /// Film coefficient between moving contents and the layers beside them, W/(m² K).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub inside_film_w_per_m2_k: Option<Number>,
    /// Contact resistance to the layer inside this one, m² K/W; none where left out.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub contact_m2_k_per_w: Option<Number>,
}

/// A material property: a number, a table or a polynomial over temperature.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(untagged)]
pub enum WrittenProperty {
    /// The same at every temperature.
    Number(Number),
    /// Straight lines between the points, the end values outside them.
    #[serde(rename_all = "snake_case")]
    Table {
        /// Temperatures, °C, ascending; 2 to 200.
        at_c: Vec<f64>,
        /// As many values, in the unit of the key.
        values: Vec<f64>,
    },
    /// `a0 + a1 T + a2 T² + ...`, T in °C, held at its end values outside `from_c` to `to_c`.
    Polynomial {
        /// Coefficients from the constant up; 1 to 6.
        polynomial_in_c: Vec<f64>,
        /// Lower end of its range, °C.
        from_c: f64,
        /// Upper end of its range, °C.
        to_c: f64,
    },
}

/// The temperatures at time zero; exactly one way of saying it.
#[derive(Clone, Debug, Default, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenStart {
    /// One temperature throughout, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub uniform_c: Option<Number>,
    /// One temperature per layer, from the inside out, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub per_layer_c: Option<Vec<Number>>,
    /// Temperatures at places, straight lines between, the end values outside.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub profile: Option<Vec<WrittenProfilePoint>>,
    /// As it has been running: the steady state of earlier surroundings.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub steady_before: Option<WrittenSteadyBefore>,
}

/// One point of a start profile.
#[derive(Clone, Copy, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenProfilePoint {
    /// Distance from the inside (centre, axis or inner face) outwards, m.
    pub from_inside_m: f64,
    /// Temperature there, °C.
    pub temperature_c: f64,
}

/// Earlier surroundings, long enough that nothing changed any more.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenSteadyBefore {
    /// The innermost layer was kept at this temperature throughout, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub contents_c: Option<Number>,
    /// What the inner face saw; insulated where left out. Not together with `contents_c`.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub inner: Option<WrittenFace>,
    /// What the outer face saw.
    pub outer: WrittenFace,
}

/// What the two faces see over time. A face that is left out is insulated.
#[derive(Clone, Debug, Default, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenSurroundings {
    /// The inner face of a slab or a hollow shape; rows by `from_s`.
    #[serde(skip_serializing_if = "Vec::is_empty", default)]
    pub inner: Vec<WrittenFace>,
    /// The outer face; rows by `from_s`.
    #[serde(skip_serializing_if = "Vec::is_empty", default)]
    pub outer: Vec<WrittenFace>,
}

/// What a face sees from a time on. One of: `insulated`, `held_c`, `heat_flux_into_w_per_m2`, or
/// `temperature_c` with `film_w_per_m2_k` or `emissivity` or both.
#[derive(Clone, Debug, Default, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenFace {
    /// From this time on, s after the stop; 0 in the first row, where it may be left out.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub from_s: Option<f64>,
    /// No heat passes.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub insulated: Option<bool>,
    /// The face itself has this temperature, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub held_c: Option<OverTimeC>,
    /// Heat flux into the item, W/m².
    #[serde(skip_serializing_if = "Option::is_none")]
    pub heat_flux_into_w_per_m2: Option<OverTimeFlux>,
    /// Temperature of the air or liquid, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub temperature_c: Option<OverTimeC>,
    /// Film coefficient, W/(m² K).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub film_w_per_m2_k: Option<Number>,
    /// Emissivity of the face towards large surroundings.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub emissivity: Option<Number>,
    /// Temperature it radiates to, °C, where that is not `temperature_c`.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub radiation_to_c: Option<OverTimeC>,
}

/// A temperature over time, °C.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(untagged)]
pub enum OverTimeC {
    /// The same all the time.
    Number(Number),
    /// From one to the other in a straight line from the start of its row, then held.
    Ramp {
        /// At the start of the row, °C.
        from_c: f64,
        /// At the end of the ramp, °C.
        to_c: f64,
        /// How long it takes, s.
        over_s: f64,
    },
    /// Straight lines between points; the end values outside, or repeated.
    Table {
        /// Times after the stop, s, ascending; 2 to 500.
        at_s: Vec<f64>,
        /// As many temperatures, °C.
        values_c: Vec<f64>,
        /// Repeats with this period, s; not shorter than the table.
        #[serde(skip_serializing_if = "Option::is_none")]
        repeats_every_s: Option<f64>,
    },
    /// A cosine: highest at `highest_at_s`, lowest half a period later.
    Cycle {
        /// Mean, °C.
        mean_c: f64,
        /// Half of highest minus lowest, K.
        amplitude_k: f64,
        /// Period, s; a day has 86 400 s.
        period_s: f64,
        /// When it is highest, s after the stop.
        highest_at_s: f64,
    },
}

/// A heat flux over time, W/m².
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(untagged)]
pub enum OverTimeFlux {
    /// The same all the time.
    Number(Number),
    /// From one to the other in a straight line from the start of its row, then held.
    Ramp {
        /// At the start of the row, W/m².
        from_w_per_m2: f64,
        /// At the end of the ramp, W/m².
        to_w_per_m2: f64,
        /// How long it takes, s.
        over_s: f64,
    },
    /// Straight lines between points; the end values outside, or repeated.
    Table {
        /// Times after the stop, s, ascending; 2 to 500.
        at_s: Vec<f64>,
        /// As many fluxes, W/m².
        values_w_per_m2: Vec<f64>,
        /// Repeats with this period, s; not shorter than the table.
        #[serde(skip_serializing_if = "Option::is_none")]
        repeats_every_s: Option<f64>,
    },
    /// A cosine: highest at `highest_at_s`, lowest half a period later.
    Cycle {
        /// Mean, W/m².
        mean_w_per_m2: f64,
        /// Half of highest minus lowest, W/m².
        amplitude_w_per_m2: f64,
        /// Period, s.
        period_s: f64,
        /// When it is highest, s after the stop.
        highest_at_s: f64,
    },
}

/// A named place; exactly one of the two distances.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenProbe {
    /// What people call it; conditions refer to it.
    pub name: String,
    /// Distance from the inside (centre, axis or inner face) outwards, m.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub from_inside_m: Option<f64>,
    /// Distance from the outer face inwards, m.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub from_outside_m: Option<f64>,
}

/// What a condition watches.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(rename_all = "lowercase")]
pub enum WrittenWhat {
    /// The hottest place of a layer or of the whole item.
    Hottest,
    /// The coldest place of a layer or of the whole item.
    Coldest,
    /// The volume mean of a layer or of the whole item.
    Mean,
    /// A probe.
    Probe,
    /// A face: `inner` or `outer`.
    Face,
    /// Hottest minus coldest of a layer or of the whole item.
    Difference,
    /// Rate of change, up or down, of the mean of a layer or of the whole item.
    Rate,
}

/// A condition to reach, or a limit not to cross; exactly one of the four limits.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[cfg_attr(not(target_arch = "wasm32"), derive(JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct WrittenCondition {
    /// What is watched.
    pub what: WrittenWhat,
    /// Of which: the name of a layer or probe, `inner` or `outer`, or `item` (the default).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub of: Option<String>,
    /// Below this temperature, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub below_c: Option<Number>,
    /// Above this temperature, °C.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub above_c: Option<Number>,
    /// Below this temperature difference, K (with `difference`).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub below_k: Option<Number>,
    /// Slower than this, K/h (with `rate`).
    #[serde(skip_serializing_if = "Option::is_none")]
    pub below_k_per_h: Option<Number>,
}
