//! The checked problem: SI and kelvin, only what can be solved.
//!
//! An [`Item`] has private fields and one way in, `check`, so everything after it may trust what it says.

mod check;
mod check_faces;
mod check_layers;
mod check_watch;
mod over_time;
mod unusual;

pub use check::{Checked, LOOK_AHEAD};
pub use check_layers::layer_name;
pub use over_time::OverTime;

use crate::matter::Law;

/// The outline across the layers, with the hollow inside of a cylinder or sphere.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Shape {
    /// Flat layers, per m² of face.
    Slab,
    /// Around an axis, per m of length; `inner_radius` in m, 0 when solid.
    Cylinder {
        /// Radius of the hollow inside, m.
        inner_radius: f64,
    },
    /// Around a point, the whole; `inner_radius` in m, 0 when solid.
    Sphere {
        /// Radius of the hollow inside, m.
        inner_radius: f64,
    },
}

impl Shape {
    /// Radius (slab: place) where the first layer begins, m.
    pub fn inner_radius(self) -> f64 {
        match self {
            Self::Slab => 0.0,
            Self::Cylinder { inner_radius } | Self::Sphere { inner_radius } => inner_radius,
        }
    }

    /// Is there an inner face that can see surroundings?
    pub fn has_inner_face(self) -> bool {
        matches!(self, Self::Slab) || self.inner_radius() > 0.0
    }
}

/// A piece of one material.
#[derive(Clone, Debug, PartialEq)]
pub struct Layer {
    /// What people call it: the written name, else the material's, else "layer 2".
    pub name: String,
    /// Thickness, m.
    pub thickness: f64,
    /// Heat capacity per volume over temperature, J/(m³ K).
    pub capacity: Law,
    /// Conductivity over temperature, W/(m K).
    pub conductivity: Law,
    /// How its contents move.
    pub motion: Motion,
    /// Contact resistance to the layer inside this one, m² K/W; 0 for the first.
    pub contact: f64,
    /// Id of the library material it is made of, if one.
    pub material: Option<&'static str>,
}

/// How the contents of a layer move.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Motion {
    /// Conduction alone.
    Still,
    /// One temperature throughout, with this film coefficient to the layers beside it, W/(m² K).
    Mixed {
        /// W/(m² K)
        film: f64,
    },
}

/// The two faces.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Side {
    /// Where the first layer begins.
    Inner,
    /// Where the last layer ends.
    Outer,
}

/// What a face sees, during one row of its programme.
#[derive(Clone, Debug, PartialEq)]
pub enum Face {
    /// No heat passes.
    Insulated,
    /// The face has this temperature, K.
    Held(OverTime),
    /// Heat flux into the item, W/m².
    HeatFlux(OverTime),
    /// Film and radiation: `film (T - temperature) + emissivity sigma (T⁴ - radiation_to⁴)` out of the item.
    Exchange {
        /// W/(m² K); may be 0 when the emissivity is not.
        film: f64,
        /// K
        temperature: OverTime,
        /// 0 to 1
        emissivity: f64,
        /// K
        radiation_to: OverTime,
    },
}

/// What a face sees over time: rows, each from its time on. Never empty, the first at 0, ascending.
#[derive(Clone, Debug, PartialEq)]
pub struct Programme {
    /// (from, s; what it sees from then on)
    pub rows: Vec<(f64, Face)>,
}

/// The temperatures at time zero, K.
#[derive(Clone, Debug, PartialEq)]
pub enum Start {
    /// One temperature throughout.
    Uniform(f64),
    /// One per layer, from the inside out.
    PerLayer(Vec<f64>),
    /// (distance from the inside, m; temperature, K), ascending; the end values outside.
    Profile(Vec<(f64, f64)>),
    /// The steady state of earlier surroundings, taken at time 0 of each face.
    SteadyBefore {
        /// The innermost layer held at this temperature, K.
        contents: Option<f64>,
        /// What the inner face saw.
        inner: Face,
        /// What the outer face saw.
        outer: Face,
    },
}

/// A part of the item.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Region {
    /// All layers.
    Whole,
    /// One layer, by its number from the inside.
    Layer(usize),
}

/// What a condition watches.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Watch {
    /// The hottest place.
    Hottest(Region),
    /// The coldest place.
    Coldest(Region),
    /// The volume mean.
    Mean(Region),
    /// The place at this distance from the inside, m.
    Place(f64),
    /// A face.
    Face(Side),
    /// Hottest minus coldest.
    Difference(Region),
    /// Absolute rate of change of the volume mean, K/s.
    Rate(Region),
}

/// Which side of the limit is meant.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Sense {
    /// Lower than the limit.
    Below,
    /// Higher than the limit.
    Above,
}

/// A condition to reach or a limit not to cross.
#[derive(Clone, Debug, PartialEq)]
pub struct Condition {
    /// What is watched.
    pub watch: Watch,
    /// Which side of the limit.
    pub sense: Sense,
    /// K; for a difference K, for a rate K/s.
    pub limit: f64,
    /// "hottest of the contents", without the limit.
    pub subject: String,
    /// JSON Pointer to where it is written.
    pub path: String,
}

/// A named place.
#[derive(Clone, Debug, PartialEq)]
pub struct Probe {
    /// What people call it.
    pub name: String,
    /// Distance from the inside, m.
    pub from_inside: f64,
}

/// What can be solved.
#[derive(Clone, Debug, PartialEq)]
pub struct Item {
    shape: Shape,
    layers: Vec<Layer>,
    inner: Programme,
    outer: Programme,
    start: Start,
    probes: Vec<Probe>,
    ready_when: Vec<Condition>,
    must_not: Vec<Condition>,
    look_ahead: f64,
}

impl Item {
    /// The outline.
    pub fn shape(&self) -> Shape {
        self.shape
    }

    /// From the inside out; 1 to 20.
    pub fn layers(&self) -> &[Layer] {
        &self.layers
    }

    /// What a face sees over time.
    pub fn face(&self, side: Side) -> &Programme {
        match side {
            Side::Inner => &self.inner,
            Side::Outer => &self.outer,
        }
    }

    /// The temperatures at time zero.
    pub fn start(&self) -> &Start {
        &self.start
    }

    /// Named places.
    pub fn probes(&self) -> &[Probe] {
        &self.probes
    }

    /// Ready when all of these hold.
    pub fn ready_when(&self) -> &[Condition] {
        &self.ready_when
    }

    /// May stand until the first of these happens.
    pub fn must_not(&self) -> &[Condition] {
        &self.must_not
    }

    /// How far to look ahead, s.
    pub fn look_ahead(&self) -> f64 {
        self.look_ahead
    }

    /// The same item with another motion of one layer.
    #[must_use]
    pub fn with_motion(&self, layer: usize, motion: Motion) -> Self {
        let mut other = self.clone();
        other.layers[layer].motion = motion;
        other
    }

    /// Sum of the thicknesses, m.
    pub fn thickness(&self) -> f64 {
        self.layers.iter().map(|layer| layer.thickness).sum()
    }
}
