//! The heat balance of every node: what flows in, and how that changes with the temperatures.

use super::faces::FaceNow;
use super::linear::Matrix;
use super::rodas::{Moment, hold};
use super::stored::VaryingNode;
use crate::item::{Face, Item, Motion};
use crate::matter::Law;
use crate::mesh::{FaceNode, Mesh, Through};

/// An item on a mesh: capacities, conductances and faces, ready to be marched.
///
/// Works on nodes and links alone, so that a mesh of any dimension can stand behind it.
#[derive(Clone, Debug)]
pub struct Balance<'a> {
    /// Heat capacity of each node, J/K; 0 where it varies with temperature.
    pub(super) constant: Vec<f64>,
    /// Capacity per volume of each layer, J/(m³ K); 0 where it varies.
    per_volume: Vec<f64>,
    /// The nodes whose capacity varies.
    pub(super) varying: Vec<VaryingNode<'a>>,
    /// The two ends of each link.
    ends: Vec<(usize, usize)>,
    /// Conductance of each link, W/K; 0 where it varies with temperature.
    conductance: Vec<f64>,
    /// The links whose conductivity varies: link, shape in m, conductivity.
    laws: Vec<(usize, f64, &'a Law)>,
    /// Inner and outer face.
    pub(super) faces: [Option<FaceNode>; 2],
    /// The links that touch the node of each face.
    pub(super) face_links: [Vec<usize>; 2],
}

impl<'a> Balance<'a> {
    /// Puts an item on a mesh made for it.
    pub fn new(item: &'a Item, mesh: &Mesh) -> Self {
        let mut balance = Self {
            constant: vec![0.0; mesh.nodes()],
            per_volume: item.layers().iter().map(|layer| layer.capacity.constant().unwrap_or(0.0)).collect(),
            varying: Vec::new(),
            ends: mesh.links.iter().map(|link| (link.a, link.b)).collect(),
            conductance: vec![0.0; mesh.links.len()],
            laws: Vec::new(),
            faces: mesh.faces,
            face_links: [Vec::new(), Vec::new()],
        };
        balance.take_volumes(item, mesh);
        for (number, link) in mesh.links.iter().enumerate() {
            balance.conductance[number] = match link.through {
                Through::Layer { layer, shape } => match &item.layers()[layer].conductivity {
                    Law::Constant(conductivity) => shape * conductivity,
                    law @ Law::Pieces(_) => {
                        balance.laws.push((number, shape, law));
                        0.0
                    }
                },
                Through::Joint { inside, area } => area / joint_resistance(item, inside),
            };
        }
        for (links, face) in balance.face_links.iter_mut().zip(balance.faces) {
            let Some(face) = face else { continue };
            links.extend((0..mesh.links.len()).filter(|&i| {
                let (a, b) = balance.ends[i];
                a == face.node || b == face.node
            }));
        }
        balance
    }

    fn take_volumes(&mut self, item: &'a Item, mesh: &Mesh) {
        let law = |layer: usize| &item.layers()[layer].capacity;
        let mut varies = vec![false; mesh.nodes()];
        for part in &mesh.parts {
            varies[part.node] |= law(part.layer).constant().is_none();
        }
        for part in &mesh.parts {
            if !varies[part.node] {
                self.constant[part.node] += part.volume * law(part.layer).constant().unwrap_or(0.0);
                continue;
            }
            let piece = (part.volume, law(part.layer));
            match self.varying.last_mut() {
                Some(node) if node.node == part.node => node.parts.push(piece),
                _ => self.varying.push(VaryingNode { node: part.node, parts: vec![piece] }),
            }
        }
    }

    /// Number of nodes.
    pub fn nodes(&self) -> usize {
        self.constant.len()
    }

    /// Heat capacity of every node at its temperature, J/K.
    pub fn capacities(&self, temperatures: &[f64], out: &mut Vec<f64>) {
        out.clear();
        out.extend_from_slice(&self.constant);
        for node in &self.varying {
            out[node.node] = node.capacity(temperatures[node.node]);
        }
    }

    /// Heat stored in the whole item, J, against a fixed reference.
    pub fn stored(&self, temperatures: &[f64]) -> f64 {
        let constant: f64 = self.constant.iter().zip(temperatures).map(|(c, t)| c * t).sum();
        let varying: f64 = self.varying.iter().map(|node| node.heat(temperatures[node.node])).sum();
        constant + varying
    }

    /// The temperature at which a shared node stores the heat that its volumes have at their layer's own.
    pub(super) fn mixed_temperature(&self, mesh: &Mesh, node: usize, layer_temperatures: &[f64]) -> f64 {
        let parts = mesh.parts.iter().filter(|part| part.node == node);
        if let Some(varying) = self.varying.iter().find(|varying| varying.node == node) {
            let heat: f64 = parts
                .zip(&varying.parts)
                .map(|(part, (volume, law))| volume * law.integral(layer_temperatures[part.layer]))
                .sum();
            let layer = mesh.parts.iter().find(|part| part.node == node).map_or(0, |part| part.layer);
            return varying.temperature(heat, layer_temperatures[layer]);
        }
        let (mut heat, mut capacity) = (0.0, 0.0);
        for part in parts {
            let share = part.volume * self.per_volume[part.layer];
            heat += share * layer_temperatures[part.layer];
            capacity += share;
        }
        heat / capacity
    }

    /// The moment at time zero with these temperatures.
    pub fn moment(&self, temperatures: Vec<f64>) -> Moment {
        let varying_heat = self.varying.iter().map(|node| node.heat(temperatures[node.node])).collect();
        Moment { time: 0.0, temperatures, varying_heat, heat_in: [0.0; 2] }
    }

    /// Puts held faces to the temperature that they have from now on; the heat comes from the surroundings.
    pub fn hold_faces(&self, faces: [&Face; 2], moment: &mut Moment) {
        let seen = faces.map(|face| FaceNow::at(face, moment.time));
        for (side, seen) in seen.into_iter().enumerate() {
            if let (Some(face), FaceNow::Held { temperature, .. }) = (self.faces[side], seen) {
                let before = moment.clone();
                hold(self, moment, side, face.node, temperature, &before);
            }
        }
    }

    /// Heat stored at a moment more than `reference`, J.
    pub fn stored_since(&self, moment: &Moment, reference: f64) -> f64 {
        let constant: f64 = self.constant.iter().zip(&moment.temperatures).map(|(c, t)| c * t).sum();
        constant + moment.varying_heat.iter().sum::<f64>() - reference
    }

    /// Rate of change of every node at a moment, K/s.
    pub fn rates(&self, faces: [&Face; 2], moment: &Moment, out: &mut Vec<f64>) {
        let seen = faces.map(|face| FaceNow::at(face, moment.time));
        let mut capacities = Vec::new();
        self.capacities(&moment.temperatures, &mut capacities);
        out.clear();
        out.resize(self.nodes(), 0.0);
        self.flows(&moment.temperatures, &seen, out);
        for (rate, capacity) in out.iter_mut().zip(&capacities) {
            *rate /= capacity;
        }
        for (face, seen) in self.faces.iter().zip(seen) {
            if let (Some(face), FaceNow::Held { slope, .. }) = (face, seen) {
                out[face.node] = slope;
            }
        }
    }

    /// Heat into every node, W: through its links, and for the faces what `seen` lets in. At a held face the
    /// heat that its links bring to it, which its surroundings take away.
    pub fn flows(&self, temperatures: &[f64], seen: &[FaceNow; 2], out: &mut [f64]) {
        self.link_flows(temperatures, out);
        for (face, seen) in self.faces.iter().zip(seen) {
            if let Some(face) = face {
                out[face.node] += seen.heat_in(temperatures[face.node], face.area).heat;
            }
        }
    }

    fn link_flows(&self, temperatures: &[f64], out: &mut [f64]) {
        out.fill(0.0);
        let temperatures = &temperatures[..out.len()];
        for (&(a, b), conductance) in self.ends.iter().zip(&self.conductance) {
            let heat = conductance * (temperatures[a] - temperatures[b]);
            out[a] -= heat;
            out[b] += heat;
        }
        for &(link, shape, law) in &self.laws {
            let (a, b) = self.ends[link];
            // Kirchhoff 1894: exact for steady flow between two temperatures, whatever the law.
            let heat = shape * (law.integral(temperatures[a]) - law.integral(temperatures[b]));
            out[a] -= heat;
            out[b] += heat;
        }
    }

    /// Minus the derivative of the flows by the temperatures, W/K.
    pub fn derivative(&self, temperatures: &[f64], seen: &[FaceNow; 2], matrix: &mut Matrix) {
        matrix.from_a.clear();
        matrix.from_a.extend_from_slice(&self.conductance);
        matrix.from_b.clear();
        matrix.from_b.extend_from_slice(&self.conductance);
        for &(link, shape, law) in &self.laws {
            let (a, b) = self.ends[link];
            matrix.from_a[link] = shape * law.value(temperatures[a]);
            matrix.from_b[link] = shape * law.value(temperatures[b]);
        }
        matrix.diagonal.clear();
        matrix.diagonal.resize(self.nodes(), 0.0);
        for ((a, b), (from_a, from_b)) in self.ends.iter().zip(matrix.from_a.iter().zip(&matrix.from_b)) {
            matrix.diagonal[*a] += from_a;
            matrix.diagonal[*b] += from_b;
        }
        for (face, seen) in self.faces.iter().zip(seen) {
            if let Some(face) = face {
                matrix.diagonal[face.node] +=
                    seen.heat_in(temperatures[face.node], face.area).less_per_kelvin;
            }
        }
    }

    /// The node at the other end of a link.
    pub(super) fn other_end(&self, link: usize, node: usize) -> usize {
        let (a, b) = self.ends[link];
        if a == node { b } else { a }
    }

    /// What a change at the far end of a link does to the heat that arrives at `node`, W/K, and back.
    pub(super) fn coupling(&self, matrix: &Matrix, link: usize, node: usize) -> (f64, f64) {
        if self.ends[link].0 == node {
            (matrix.from_b[link], matrix.from_a[link])
        } else {
            (matrix.from_a[link], matrix.from_b[link])
        }
    }

    /// Turns the row of a node into "does not change".
    pub(super) fn fix(&self, matrix: &mut Matrix, node: usize, links: impl Iterator<Item = usize>) {
        matrix.diagonal[node] = 1.0;
        for link in links {
            if self.ends[link].0 == node {
                matrix.from_b[link] = 0.0;
            } else {
                matrix.from_a[link] = 0.0;
            }
        }
    }

    /// All links that touch a node.
    pub(super) fn links_of(&self, node: usize) -> impl Iterator<Item = usize> + '_ {
        (0..self.ends.len()).filter(move |&link| self.ends[link].0 == node || self.ends[link].1 == node)
    }
}

/// Resistance of the joint outside layer `inside`, m² K/W: contact, and a film on each side that moves.
fn joint_resistance(item: &Item, inside: usize) -> f64 {
    let film = |layer: usize| match item.layers()[layer].motion {
        Motion::Still => 0.0,
        Motion::Mixed { film } => 1.0 / film,
    };
    item.layers()[inside + 1].contact + film(inside) + film(inside + 1)
}
