//! The mesh of one dimension: layers from the inside out, as slab, cylinder or sphere.

use super::{FaceNode, Link, Mesh, Part, Through};
use crate::item::Shape;
use std::f64::consts::{FRAC_PI_2, PI};

/// What the mesh needs to know of the item.
#[derive(Clone, Debug, PartialEq)]
pub struct Line {
    /// The outline.
    pub shape: Shape,
    /// From the inside out.
    pub layers: Vec<LineLayer>,
    /// Does heat pass the inner and the outer face? Nodes are drawn towards such a face.
    pub active: [bool; 2],
}

/// One layer of the mesh to be.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct LineLayer {
    /// m
    pub thickness: f64,
    /// Has it one temperature throughout? Then it is one node.
    pub mixed: bool,
    /// Does the joint to the layer inside it resist? Then the two sides have nodes of their own.
    pub joint_resists: bool,
    /// Cells across it, at least 1; not used where mixed.
    pub cells: usize,
}

/// The mesh of a line of layers. Doubling every `cells` halves every cell: one smooth map per layer.
pub fn line(line: &Line) -> Mesh {
    let mut mesh = Mesh {
        places: Vec::new(),
        parts: Vec::new(),
        links: Vec::new(),
        layers: Vec::new(),
        ends: Vec::new(),
        faces: [None, None],
    };
    let mut inside = 0.0;
    for number in 0..line.layers.len() {
        add_layer(&mut mesh, line, number, inside);
        inside += line.layers[number].thickness;
        mesh.ends.push(inside);
    }
    let radius = line.shape.inner_radius();
    if line.shape.has_inner_face() {
        mesh.faces[0] = Some(FaceNode { node: 0, area: area(line.shape, radius) });
    }
    mesh.faces[1] = Some(FaceNode { node: mesh.nodes() - 1, area: area(line.shape, radius + inside) });
    mesh
}

fn add_layer(mesh: &mut Mesh, line: &Line, number: usize, inside: f64) {
    let layer = line.layers[number];
    let radius = line.shape.inner_radius();
    let joined = number > 0 && !layer.mixed && !layer.joint_resists && !line.layers[number - 1].mixed;
    let first = if joined { mesh.nodes() - 1 } else { mesh.nodes() };
    if number > 0 && !joined {
        let area = area(line.shape, radius + inside);
        mesh.links.push(Link {
            a: first - 1,
            b: first,
            through: Through::Joint { inside: number - 1, area },
        });
    }
    if layer.mixed {
        mesh.places.push(inside + 0.5 * layer.thickness);
        let volume =
            volume(line.shape, radius + inside + layer.thickness) - volume(line.shape, radius + inside);
        mesh.parts.push(Part { node: first, layer: number, volume });
    } else {
        let edges = edges(line, number, inside);
        mesh.places.extend(&edges[usize::from(joined)..]);
        add_cells(mesh, line.shape, number, first, &edges);
    }
    mesh.layers.push((first, mesh.nodes() - 1));
}

/// Links and volumes of a still layer whose nodes sit at `edges`, the first of them node `first`.
fn add_cells(mesh: &mut Mesh, shape: Shape, layer: usize, first: usize, edges: &[f64]) {
    let radius = shape.inner_radius();
    let mut reached = volume(shape, radius + edges[0]);
    for (i, pair) in edges.windows(2).enumerate() {
        let (from, to) = (radius + pair[0], radius + pair[1]);
        let through = Through::Layer { layer, shape: shape_factor(shape, from, to, layer == 0) };
        mesh.links.push(Link { a: first + i, b: first + i + 1, through });
        let middle = volume(shape, 0.5 * (from + to));
        let end = volume(shape, to);
        add_part(mesh, first + i, layer, middle - reached);
        add_part(mesh, first + i + 1, layer, end - middle);
        reached = end;
    }
}

/// Adds to the node's volume in this layer.
fn add_part(mesh: &mut Mesh, node: usize, layer: usize, volume: f64) {
    match mesh.parts.last_mut() {
        Some(part) if part.node == node && part.layer == layer => part.volume += volume,
        _ => mesh.parts.push(Part { node, layer, volume }),
    }
}

/// Places of the nodes of a still layer, drawn by a cosine towards each side that heat passes.
fn edges(line: &Line, number: usize, inside: f64) -> Vec<f64> {
    let layer = line.layers[number];
    let inwards = number > 0 || (line.active[0] && line.shape.has_inner_face());
    let outwards = number + 1 < line.layers.len() || line.active[1];
    let place = |i: usize| {
        let s = i as f64 / layer.cells as f64;
        let drawn = match (inwards, outwards) {
            (true, true) => 0.5 * (1.0 - libm::cos(PI * s)),
            (false, true) => libm::sin(FRAC_PI_2 * s),
            (true, false) => 1.0 - libm::cos(FRAC_PI_2 * s),
            (false, false) => s,
        };
        inside + layer.thickness * drawn
    };
    let mut places: Vec<f64> = (0..=layer.cells).map(place).collect();
    places[layer.cells] = inside + layer.thickness;
    places
}

/// Area at a radius (slab: any place), m².
fn area(shape: Shape, radius: f64) -> f64 {
    match shape {
        Shape::Slab => 1.0,
        Shape::Cylinder { .. } => 2.0 * PI * radius,
        Shape::Sphere { .. } => 4.0 * PI * radius * radius,
    }
}

/// Volume inside a radius (slab: up to a place), m³.
fn volume(shape: Shape, radius: f64) -> f64 {
    match shape {
        Shape::Slab => radius,
        Shape::Cylinder { .. } => PI * radius * radius,
        Shape::Sphere { .. } => 4.0 / 3.0 * PI * radius * radius * radius,
    }
}

/// Area over length of a link between two radii, m.
///
/// In a solid core the area at the middle, which is exact for a parabola, the profile that such a core takes
/// on; in all other layers the exact steady form (cylinder `2 pi / ln(b/a)`, sphere `4 pi a b / (b - a)`), the
/// profile that a shell takes on. Both are of order 2.
fn shape_factor(shape: Shape, from: f64, to: f64, innermost: bool) -> f64 {
    let length = to - from;
    if innermost && shape.inner_radius() == 0.0 {
        return area(shape, 0.5 * (from + to)) / length;
    }
    match shape {
        Shape::Slab => 1.0 / length,
        // ln(1 + x) by its own function: cells may be thin against their radius.
        Shape::Cylinder { .. } => 2.0 * PI / libm::log1p(length / from),
        Shape::Sphere { .. } => 4.0 * PI * from * to / length,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    fn layers(cells: usize) -> Vec<LineLayer> {
        let still = |thickness, joint_resists| LineLayer { thickness, mixed: false, joint_resists, cells };
        vec![
            still(0.4, false),
            still(0.01, false),
            LineLayer { thickness: 0.1, mixed: true, joint_resists: false, cells: 1 },
            still(0.08, true),
        ]
    }

    #[test]
    fn volumes_and_areas_are_those_of_the_shape() {
        let shapes = [
            (Shape::Slab, 0.59, 1.0),
            (Shape::Cylinder { inner_radius: 0.0 }, PI * 0.59 * 0.59, 2.0 * PI * 0.59),
            (
                Shape::Sphere { inner_radius: 0.1 },
                4.0 / 3.0 * PI * (0.69 * 0.69 * 0.69 - 0.001),
                4.0 * PI * 0.69 * 0.69,
            ),
        ];
        for (shape, whole, outer) in shapes {
            let mesh = line(&Line { shape, layers: layers(7), active: [false, true] });
            let sum: f64 = mesh.parts.iter().map(|part| part.volume).sum();
            assert_relative_eq!(sum, whole, max_relative = 1e-13);
            assert_relative_eq!(mesh.faces[1].unwrap().area, outer, max_relative = 1e-13);
            assert_eq!(mesh.links.len(), mesh.nodes() - 1);
            assert!(mesh.links.iter().enumerate().all(|(i, link)| link.a == i && link.b == i + 1));
        }
    }

    #[test]
    fn a_finer_mesh_keeps_the_nodes_of_the_coarser() {
        let shape = Shape::Cylinder { inner_radius: 0.0 };
        let coarse = line(&Line { shape, layers: layers(5), active: [false, true] });
        let fine = line(&Line { shape, layers: layers(10), active: [false, true] });
        for place in &coarse.places {
            assert!(fine.places.iter().any(|other| (other - place).abs() < 1e-15), "{place}");
        }
    }
}
