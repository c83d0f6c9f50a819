//! What stands beside the cut: one row for each layer and for each side of one, from the outside in.

use super::super::layers::LayerColumns;
use super::super::number::tenths;
use super::cut::Cut;
use super::{Outline, Section};

/// One row of text and where it points to.
#[derive(Clone, Debug, PartialEq)]
pub struct Row {
    /// Where along the cut, px.
    pub along: f64,
    /// Before the rest, bold: a temperature.
    pub strong: String,
    /// A name that may be shortened.
    pub name: String,
    /// What follows and is never shortened.
    pub rest: String,
    /// Where rows have to go, those of the lowest rank go first.
    rank: f64,
}

/// Ranks: joints go first, then layers, each from the thinnest on.
const LAYER_RANK: f64 = 1e6;
const FACE_RANK: f64 = 1e12;

/// The rows, from the outside in; no more than `most`.
pub fn rows(section: &Section, cut: &Cut, most: usize) -> Vec<Row> {
    let mut rows = all(section, cut);
    while rows.len() > most.max(2) {
        let ranks = rows.iter().map(|row| row.rank).enumerate();
        let lowest = ranks.min_by(|a, b| a.1.total_cmp(&b.1)).map_or(0, |(number, _)| number);
        rows.remove(lowest);
    }
    rows
}

/// How many there are.
pub fn count(section: &Section) -> usize {
    2 * section.layers.len() + 1 + usize::from(section.outline.hollow().is_some())
}

fn all(section: &Section, cut: &Cut) -> Vec<Row> {
    let layers = section.layers;
    let mut rows = Vec::new();
    for (number, layer) in layers.iter().enumerate().rev() {
        let (inside, outside) = (cut.at[number], cut.at[number + 1]);
        rows.push(side_row(section, number + 1, outside));
        rows.push(Row {
            along: 0.5 * (inside + outside),
            strong: String::new(),
            name: layer.name.to_owned(),
            rest: format!(", {}{}", layer.thickness_words, if cut.widened[number] { "*" } else { "" }),
            rank: LAYER_RANK * (1.0 + layer.thickness / section.thickness()),
        });
    }
    rows.push(side_row(section, 0, cut.at[0]));
    if let Some(hollow) = section.outline.hollow() {
        rows.push(Row {
            along: (cut.at[0] - HOLLOW_DEPTH).max(0.5 * cut.at[0]),
            strong: String::new(),
            name: "hollow".to_owned(),
            rest: format!(", radius {}", hollow.words),
            rank: FACE_RANK,
        });
    }
    rows
}

/// How far inside the inner face the row of the hollow points, px.
const HOLLOW_DEPTH: f64 = 14.0;

/// The row of a side of layers: 0 is the innermost.
fn side_row(section: &Section, side: usize, along: f64) -> Row {
    let layers = section.layers;
    let inner = side.checked_sub(1).map(|number| &layers[number]);
    let outer = layers.get(side);
    let rank = match (inner, outer) {
        (Some(a), Some(b)) => a.thickness.min(b.thickness) / section.thickness(),
        _ => FACE_RANK,
    };
    Row {
        along,
        strong: format!("{} {}", values(inner, outer), section.unit),
        name: String::new(),
        rest: place_words(section.outline, inner.is_some(), outer.is_some()).to_owned(),
        rank,
    }
}

/// "77.1", or "77.1 to 71.4" across a contact that resists.
fn values(inner: Option<&LayerColumns>, outer: Option<&LayerColumns>) -> String {
    let inside = inner.map(|layer| tenths(layer.outside()));
    let outside = outer.map(|layer| tenths(layer.inside()));
    match (inside, outside) {
        (Some(a), Some(b)) if a != b => format!("{a} to {b}"),
        (Some(a), _) | (None, Some(a)) => a,
        (None, None) => String::new(),
    }
}

/// What the place is called, with a space before it.
fn place_words(outline: Outline, has_inner: bool, has_outer: bool) -> &'static str {
    match (has_inner, has_outer) {
        (true, true) | (false, false) => "",
        (true, false) => " outer face",
        (false, true) => match outline {
            Outline::Cylinder { hollow: None } => " axis",
            Outline::Sphere { hollow: None } => " centre",
            Outline::Slab | Outline::Cylinder { .. } | Outline::Sphere { .. } => " inner face",
        },
    }
}
