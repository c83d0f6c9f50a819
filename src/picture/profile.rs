//! Temperature from the inside to the outside at one moment, and at the start.

use super::axis::{number, ticks};
use super::curve::{Field, degrees};
use super::painter::{Anchor, Painter, Stroke, Type, fitting};
use super::palette::{Inks, Theme};

/// One layer of the picture.
#[derive(Clone, Debug)]
pub struct ProfileLayer {
    /// What it is called.
    pub name: String,
    /// Its first and its last node.
    pub nodes: (usize, usize),
    /// Where it begins and ends, in the unit shown.
    pub edges: (f64, f64),
}

/// What the picture shows.
#[derive(Clone, Debug)]
pub struct Profile<'a> {
    /// Place of each node from the inside, in the unit shown.
    pub places: Vec<f64>,
    /// Temperatures at the moment, in the unit shown, one per node.
    pub now: &'a [f64],
    /// At the start.
    pub start: &'a [f64],
    /// From the inside out.
    pub layers: Vec<ProfileLayer>,
    /// "°C"
    pub unit: &'static str,
    /// "mm"
    pub length_unit: &'static str,
    /// Coldest and hottest of the whole course.
    pub extent: (f64, f64),
}

const SMALL: f64 = 12.0;

/// Draws the profile into a picture of this size, px.
pub fn profile(on: &mut dyn Painter, width: f64, height: f64, theme: Theme, what: &Profile<'_>) {
    let inks = theme.inks();
    let outer = what.layers.last().map_or(1.0, |layer| layer.edges.1);
    let room = (0.06 * (what.extent.1 - what.extent.0)).max(0.5);
    let field = Field {
        left: 38.0,
        right: width - 12.0,
        top: 22.0,
        bottom: height - 26.0,
        x: (0.0, outer),
        y: (what.extent.0 - room, what.extent.1 + room),
    };
    degrees(on, &field, what.unit, &inks);
    name_layers(on, &field, what, &inks);
    lengths(on, &field, what, &inks);
    line(on, &field, what, what.start, Stroke { colour: inks.soft, width: 1.4, dash: &[3.0, 3.0] });
    line(on, &field, what, what.now, Stroke { colour: inks.lines[0], width: 2.4, dash: &[] });
}

/// Layer by layer, so that a joint that resists shows as a jump; one that mixes itself as a level line.
fn line(on: &mut dyn Painter, field: &Field, what: &Profile<'_>, temperatures: &[f64], stroke: Stroke) {
    let mut points = Vec::new();
    for ProfileLayer { nodes: (first, last), edges: (from, to), .. } in &what.layers {
        if first == last {
            let y = field.up(temperatures[*first]);
            points.extend([(field.across(*from), y), (field.across(*to), y)]);
        } else {
            points
                .extend((*first..=*last).map(|i| (field.across(what.places[i]), field.up(temperatures[i]))));
        }
    }
    on.line(&points, stroke);
}

fn name_layers(on: &mut dyn Painter, field: &Field, what: &Profile<'_>, inks: &Inks) {
    let set = Type { size: SMALL, bold: true, anchor: Anchor::Middle, colour: inks.ink };
    for ProfileLayer { name, edges: (from, to), .. } in &what.layers {
        let (left, right) = (field.across(*from), field.across(*to));
        let edge = Stroke { colour: inks.soft, width: 1.0, dash: &[] };
        on.line(&[(right, field.top), (right, field.bottom)], edge);
        let text = fitting(on, name, set, right - left - 8.0);
        // A letter and an ellipsis say nothing.
        if text.chars().count() > 3 || text == *name {
            on.text((0.5 * (left + right), field.top - 8.0), &text, set);
        }
    }
}

fn lengths(on: &mut dyn Painter, field: &Field, what: &Profile<'_>, inks: &Inks) {
    let set = |anchor| Type { size: SMALL, bold: false, anchor, colour: inks.soft };
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let count = ((field.right - field.left) / 70.0).max(2.0) as usize;
    let values = ticks(0.0, field.x.1, count);
    let step = if values.len() > 1 { values[1] - values[0] } else { 1.0 };
    let last = values.len().saturating_sub(1);
    for (i, value) in values.into_iter().enumerate() {
        let x = field.across(value);
        on.line(
            &[(x, field.bottom), (x, field.bottom + 4.0)],
            Stroke { colour: inks.soft, width: 1.0, dash: &[] },
        );
        let text = number(value, step);
        let text = if i == last { format!("{text} {}", what.length_unit) } else { text };
        let half = 0.5 * on.width_of(&text, set(Anchor::Middle));
        on.text((x.min(field.right + 12.0 - half), field.bottom + 17.0), &text, set(Anchor::Middle));
    }
}
