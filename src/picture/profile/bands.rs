//! The layers behind a profile: shaded bands, with their names above.

use super::super::layers::{LayerColumns, sides};
use super::super::painter::{Anchor, Path, Rect, Stroke, Weight};
use super::super::pen::{Hand, Pen};
use super::super::plot::Plot;
use super::super::spread::{fits, spread};

/// Gap between two names, px.
const GAP: f64 = 12.0;
/// A name is not shortened to less than this, px.
const LEAST: f64 = 44.0;
/// Height of the lines that lead from a name to its band, px.
pub const LEAD: f64 = 12.0;

/// Bands and the lines between them.
pub fn draw(pen: &mut Pen, plot: &Plot, layers: &[LayerColumns]) {
    let edges: Vec<f64> = sides(layers).iter().map(|side| plot.x(*side)).collect();
    for pair in edges.windows(2).skip(1).step_by(2) {
        pen.fill(&Path::rect(Rect { left: pair[0], right: pair[1], ..plot.area }), pen.inks.shade);
    }
}

/// Lines between the layers, over the grid.
pub fn draw_sides(pen: &mut Pen, plot: &Plot, layers: &[LayerColumns]) {
    let stroke = Stroke { opacity: 0.55, ..Stroke::plain(pen.inks.quiet, 1.0) };
    for side in sides(layers) {
        pen.upright(plot.x(side), plot.area.top, plot.area.bottom, &stroke);
    }
}

/// The names in one row above from `left` to `right`, px, each led to the middle of its band. Names are shortened evenly where they crowd;
/// where that is not enough the thinnest layers go without.
pub fn draw_names(pen: &mut Pen, plot: &Plot, layers: &[LayerColumns], y: f64, left: f64, right: f64) {
    let named = names(pen, plot, layers, right - left);
    let sizes: Vec<f64> = named.iter().map(|(_, name)| pen.width(name, Weight::Regular) + GAP).collect();
    let places: Vec<f64> = named.iter().map(|((begin, end), _)| 0.5 * (begin + end)).collect();
    let hand = Hand { colour: pen.inks.ink, ..pen.quiet(Anchor::Middle) };
    let lead = Stroke::plain(pen.inks.quiet, 1.0);
    let middles = spread(&places, &sizes, left - 0.5 * GAP, right + 0.5 * GAP);
    let top = y + 0.5 * pen.size + 2.0;
    for (((begin, end), name), middle) in named.iter().zip(middles) {
        pen.write(name, (middle, y), &hand);
        // A name above its own band needs no slanting line.
        let inset = (0.5 * (end - begin)).min(6.0);
        let to = middle.max(begin + inset).min(end - inset);
        let line = [(middle, top), (middle, top + 2.0), (to, top + LEAD - 2.0), (to, top + LEAD + 3.0)];
        pen.painter.stroke(&Path::through(&line), &lead);
    }
}

/// (begin and end of the band, px; name), from the inside out.
fn names(pen: &Pen, plot: &Plot, layers: &[LayerColumns], width: f64) -> Vec<((f64, f64), String)> {
    let edges: Vec<f64> = sides(layers).iter().map(|side| plot.x(*side)).collect();
    let mut chosen: Vec<usize> = (0..layers.len()).collect();
    while !chosen.is_empty() {
        if let Some(names) = shortened(pen, layers, &chosen, width) {
            let bands = chosen.iter().map(|i| (edges[*i], edges[*i + 1]));
            return bands.zip(names).collect();
        }
        let thickness = |place: &usize| layers[chosen[*place]].thickness;
        let thinnest = (0..chosen.len()).min_by(|a, b| thickness(a).total_cmp(&thickness(b)));
        chosen.remove(thinnest.unwrap_or(0));
    }
    Vec::new()
}

/// The names of the chosen layers, no longer than they have to be to fit into `width` side by side.
fn shortened(pen: &Pen, layers: &[LayerColumns], chosen: &[usize], width: f64) -> Option<Vec<String>> {
    let mut cap = width;
    while cap >= LEAST {
        let short = |i: &usize| pen.shortened(layers[*i].name, cap, Weight::Regular);
        let names: Vec<String> = chosen.iter().map(short).collect();
        let sizes: Vec<f64> = names.iter().map(|name| pen.width(name, Weight::Regular) + GAP).collect();
        if names.iter().all(|name| !name.is_empty()) && fits(&sizes, 0.0, width + GAP) {
            return Some(names);
        }
        cap *= 0.92;
    }
    None
}
