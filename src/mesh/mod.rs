//! Nodes, links, volumes and areas. Knows no temperature, no material and no time.
//!
//! Nodes sit at the centre, the joints and the faces, and graded between them; each owns the volume up to the
//! middle of its links (vertex-centred finite volumes). Order 2 holds from the coarsest mesh on, and the
//! temperature of a face is an unknown of its own, not a reconstruction.

mod line;

pub use line::{Line, LineLayer, line};

/// Nodes and what connects them. Per m² (slab), per m (cylinder), the whole (sphere).
#[derive(Clone, Debug, PartialEq)]
pub struct Mesh {
    /// Place of each node: distance from the inside, m, ascending (equal at a joint that resists).
    pub places: Vec<f64>,
    /// Volumes of the nodes, one entry per node and layer it reaches into.
    pub parts: Vec<Part>,
    /// What connects the nodes. In one dimension link `i` joins the nodes `i` and `i + 1`.
    pub links: Vec<Link>,
    /// The nodes of each layer, from the inside out, as (first, last).
    pub layers: Vec<(usize, usize)>,
    /// Where each layer ends: distance from the inside, m, ascending.
    pub ends: Vec<f64>,
    /// The inner and the outer face, where there is one.
    pub faces: [Option<FaceNode>; 2],
}

/// A piece of volume that belongs to a node.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Part {
    /// The node.
    pub node: usize,
    /// The layer it lies in.
    pub layer: usize,
    /// m³ (per m², per m)
    pub volume: f64,
}

/// A path for heat between two nodes.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Link {
    /// One end, on the inner side.
    pub a: usize,
    /// The other end, on the outer side.
    pub b: usize,
    /// What the heat goes through.
    pub through: Through,
}

/// What a link goes through.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Through {
    /// A layer: heat = shape x integral of the conductivity between the two temperatures.
    Layer {
        /// The layer.
        layer: usize,
        /// Area over length, m (per m², per m).
        shape: f64,
    },
    /// The joint outside a layer: heat = area x temperature difference / resistance.
    Joint {
        /// The layer inside the joint.
        inside: usize,
        /// m² (per m², per m)
        area: f64,
    },
}

/// A node that sees surroundings.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct FaceNode {
    /// The node.
    pub node: usize,
    /// m² (per m², per m)
    pub area: f64,
}

impl Mesh {
    /// Number of nodes.
    pub fn nodes(&self) -> usize {
        self.places.len()
    }
}
