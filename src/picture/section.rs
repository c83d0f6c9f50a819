//! The item cut open, to scale, shaded by temperature.

use super::painter::{Anchor, Colour, Painter, Stroke, Type, fitting, rectangle};
use super::palette::{Inks, Theme, ramp};
use std::f64::consts::FRAC_PI_2;

/// How the layers lie.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Outline {
    /// Side by side.
    Flat,
    /// Around an axis or a point.
    Round,
}

/// One layer of the picture.
#[derive(Clone, Debug)]
pub struct SectionLayer {
    /// What it is called.
    pub name: String,
    /// Its thickness in words: "400 mm".
    pub thickness: String,
    /// Its first and its last node.
    pub nodes: (usize, usize),
    /// Where it begins and ends, m from the axis, the centre or the inner face.
    pub edges: (f64, f64),
}

/// What the picture shows; temperatures in the unit shown.
#[derive(Clone, Debug)]
pub struct Section<'a> {
    /// How the layers lie.
    pub outline: Outline,
    /// From the inside out.
    pub layers: Vec<SectionLayer>,
    /// Place of each node, m from the axis, the centre or the inner face.
    pub places: Vec<f64>,
    /// Temperature of each node.
    pub temperatures: &'a [f64],
    /// "°C"
    pub unit: &'static str,
    /// Coldest and hottest of the whole course.
    pub extent: (f64, f64),
}

/// Strips that shade each layer.
const STRIPS: usize = 48;
const SMALL: f64 = 12.0;
const LINE: f64 = 15.0;

/// Draws a section into a picture of this size, px.
pub fn section(on: &mut dyn Painter, width: f64, height: f64, theme: Theme, what: &Section<'_>) {
    let inks = theme.inks();
    let labels = (0.46 * width).clamp(120.0, 240.0);
    let scale_height = 34.0;
    let side = (width - labels - 14.0).min(height - scale_height - 10.0).max(60.0);
    let body =
        Body { left: 2.0, top: 6.0, side, outer: what.layers.last().map_or(1.0, |layer| layer.edges.1) };
    for layer in what.layers.iter().rev() {
        shade(on, &body, what, layer);
    }
    hollow(on, &body, what, &inks);
    for layer in &what.layers {
        boundary(on, &body, what.outline, layer.edges.1, &inks);
    }
    name_layers(on, &body, what, width, &inks);
    colour_scale(on, body.left, height - scale_height + 6.0, side.max(150.0), what, &inks);
}

/// Where the item stands in the picture.
struct Body {
    left: f64,
    top: f64,
    /// Length of the thickness and of the height, px.
    side: f64,
    /// Place of the outer face, m.
    outer: f64,
}

impl Body {
    fn length(&self, place: f64) -> f64 {
        self.side * place / self.outer
    }

    fn bottom(&self) -> f64 {
        self.top + self.side
    }

    /// A quarter circle around the lower left corner.
    fn quarter(&self, place: f64) -> Vec<(f64, f64)> {
        let radius = self.length(place);
        let point = |i: i32| {
            let angle = FRAC_PI_2 * f64::from(i) / 32.0;
            (self.left + radius * libm::sin(angle), self.bottom() - radius * libm::cos(angle))
        };
        (0..=32).map(point).collect()
    }
}

fn shade(on: &mut dyn Painter, body: &Body, what: &Section<'_>, layer: &SectionLayer) {
    let (from, to) = layer.edges;
    // Finer than two pixels nobody sees.
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let seen = (0.5 * body.length(to - from)).ceil() as usize;
    let strips = if layer.nodes.0 == layer.nodes.1 { 1 } else { seen.clamp(1, STRIPS) };
    for i in (0..strips).rev() {
        let part = |i: usize| from + (to - from) * i as f64 / strips as f64;
        let colour = colour(what, temperature_in(what, layer, 0.5 * (part(i) + part(i + 1))));
        match what.outline {
            Outline::Flat => {
                let left = body.left + body.length(part(i));
                // Half a pixel over the neighbour, so that no paper shows between them.
                let wide =
                    body.length(part(i + 1)) - body.length(part(i)) + if i + 1 < strips { 0.5 } else { 0.0 };
                rectangle(on, left, body.top, wide, body.side, colour);
            }
            Outline::Round => {
                let mut area = body.quarter(part(i + 1));
                area.push((body.left, body.bottom()));
                on.fill(&area, colour);
            }
        }
    }
}

/// Temperature within a layer: straight between its nodes.
fn temperature_in(what: &Section<'_>, layer: &SectionLayer, place: f64) -> f64 {
    let (first, last) = layer.nodes;
    let after = what.places[first..=last].partition_point(|&node| node <= place) + first;
    if after == first {
        return what.temperatures[first];
    }
    if after > last {
        return what.temperatures[last];
    }
    let (x0, x1) = (what.places[after - 1], what.places[after]);
    let (t0, t1) = (what.temperatures[after - 1], what.temperatures[after]);
    t0 + (t1 - t0) * (place - x0) / (x1 - x0)
}

fn colour(what: &Section<'_>, temperature: f64) -> Colour {
    let (low, high) = what.extent;
    ramp(if high > low { (temperature - low) / (high - low) } else { 0.5 })
}

fn hollow(on: &mut dyn Painter, body: &Body, what: &Section<'_>, inks: &Inks) {
    let Some(first) = what.layers.first() else { return };
    if what.outline == Outline::Round && first.edges.0 > 0.0 {
        let mut area = body.quarter(first.edges.0);
        area.push((body.left, body.bottom()));
        on.fill(&area, inks.paper);
        boundary(on, body, what.outline, first.edges.0, inks);
    }
}

fn boundary(on: &mut dyn Painter, body: &Body, outline: Outline, place: f64, inks: &Inks) {
    let stroke = Stroke { colour: inks.ink, width: 1.0, dash: &[] };
    match outline {
        Outline::Flat => {
            let x = body.left + body.length(place);
            on.line(&[(x, body.top), (x, body.bottom())], stroke);
        }
        Outline::Round => on.line(&body.quarter(place), stroke),
    }
}

/// One label for each layer in a column on the right, the outermost on top, with a level line to its layer.
fn name_layers(on: &mut dyn Painter, body: &Body, what: &Section<'_>, width: f64, inks: &Inks) {
    let left = body.left + body.side + 16.0;
    let room = width - left - 2.0;
    let bold = Type { size: SMALL + 0.5, bold: true, anchor: Anchor::Start, colour: inks.ink };
    let plain = Type { size: SMALL, bold: false, anchor: Anchor::Start, colour: inks.soft };
    let lines = if body.side / what.layers.len() as f64 >= 2.0 * LINE + 6.0 { 2.0 } else { 1.0 };
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let fits = (body.side / (lines * LINE + 2.0)).floor().max(1.0) as usize;
    let shown = what.layers.len().min(fits);
    // Where not all fit, the thickest are named; the table has them all.
    let mut order: Vec<usize> = (0..what.layers.len()).collect();
    order.sort_by(|&a, &b| thickness(&what.layers[b]).total_cmp(&thickness(&what.layers[a])));
    order.truncate(shown);
    order.sort_unstable();
    let gap = body.side / shown as f64;
    for (row, &number) in order.iter().rev().enumerate() {
        let layer = &what.layers[number];
        let level = body.top + gap * (row as f64 + 0.5);
        leader(on, body, what.outline, layer, level, left, inks);
        let name = fitting(on, &layer.name, bold, room);
        if lines < 2.0 {
            on.text((left, level + 4.0), &name, bold);
            continue;
        }
        on.text((left, level - 2.0), &name, bold);
        let said = fitting(on, &said(what, layer), plain, room);
        on.text((left, level - 2.0 + LINE), &said, plain);
    }
}

fn thickness(layer: &SectionLayer) -> f64 {
    layer.edges.1 - layer.edges.0
}

/// "400 mm, 92 to 88.1 °C"
fn said(what: &Section<'_>, layer: &SectionLayer) -> String {
    let (inside, outside) = (what.temperatures[layer.nodes.0], what.temperatures[layer.nodes.1]);
    let (a, b) = (tenth(inside), tenth(outside));
    let unit = what.unit;
    if a == b {
        format!("{}, {a} {unit}", layer.thickness)
    } else {
        format!("{}, {a} to {b} {unit}", layer.thickness)
    }
}

/// To a tenth.
pub fn tenth(value: f64) -> String {
    let text = format!("{value:.1}");
    if text == "-0.0" { "0.0".to_owned() } else { text.replace('-', "−") }
}

/// A level line from the middle of a layer to its label.
fn leader(
    on: &mut dyn Painter,
    body: &Body,
    outline: Outline,
    layer: &SectionLayer,
    level: f64,
    to: f64,
    inks: &Inks,
) {
    let radius = body.length(0.5 * (layer.edges.0 + layer.edges.1));
    let (x, y) = match outline {
        Outline::Flat => (body.left + radius, level),
        Outline::Round => {
            let up = body.bottom() - level;
            if up < radius {
                (body.left + (radius * radius - up * up).sqrt(), level)
            } else {
                // Above the layer: to its top, then down.
                (body.left + 0.2 * radius, body.bottom() - 0.98 * radius)
            }
        }
    };
    let stroke = Stroke { colour: inks.ink, width: 0.8, dash: &[] };
    on.line(&[(x, y), (x.max(body.left + 8.0), level), (to - 4.0, level)], stroke);
    let dot: Vec<(f64, f64)> = (0..12)
        .map(|i| {
            let angle = 4.0 * FRAC_PI_2 * f64::from(i) / 12.0;
            (x + 2.2 * libm::cos(angle), y + 2.2 * libm::sin(angle))
        })
        .collect();
    on.fill(&dot, inks.ink);
}

fn colour_scale(on: &mut dyn Painter, left: f64, top: f64, width: f64, what: &Section<'_>, inks: &Inks) {
    let steps = 60;
    let wide = width / f64::from(steps);
    for i in 0..steps {
        let colour = ramp((f64::from(i) + 0.5) / f64::from(steps));
        rectangle(on, left + wide * f64::from(i), top, wide + 0.5, 9.0, colour);
    }
    let set = |anchor| Type { size: SMALL, bold: false, anchor, colour: inks.soft };
    let (low, high) = what.extent;
    let below = top + 9.0 + 14.0;
    on.text((left, below), &tenth(low), set(Anchor::Start));
    on.text((left + 0.5 * width, below), &tenth(0.5 * (low + high)), set(Anchor::Middle));
    on.text((left + width, below), &format!("{} {}", tenth(high), what.unit), set(Anchor::End));
}
