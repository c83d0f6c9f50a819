//! Temperatures over the clock, with limits and the moments that were asked for.

use super::axis::{number, spread, ticks, time_ticks};
use super::painter::{Anchor, Colour, Painter, Stroke, Type, fitting, rectangle};
use super::palette::{Inks, Theme};
use crate::units::clock::Clock;

/// One line.
#[derive(Clone, Debug)]
pub struct CurveLine {
    /// What it shows.
    pub name: String,
    /// One value per time, in the unit shown.
    pub values: Vec<f64>,
}

/// What the picture shows.
#[derive(Clone, Debug)]
pub struct Curve {
    /// s after the stop.
    pub times: Vec<f64>,
    /// The lines; four at most are drawn.
    pub lines: Vec<CurveLine>,
    /// Limits: value in the unit shown, words.
    pub limits: Vec<(f64, String)>,
    /// Moments: s after the stop, words.
    pub marks: Vec<(f64, String)>,
    /// The moment of the slider, s.
    pub cursor: Option<f64>,
    /// The wall clock at the stop.
    pub clock: Option<Clock>,
    /// "°C"
    pub unit: &'static str,
}

const SMALL: f64 = 12.0;
const DASHES: [&[f64]; 4] = [&[], &[8.0, 3.0], &[2.5, 2.5], &[10.0, 3.0, 2.0, 3.0]];

/// The field of a diagram within its axes.
pub(super) struct Field {
    pub left: f64,
    pub right: f64,
    pub top: f64,
    pub bottom: f64,
    pub x: (f64, f64),
    pub y: (f64, f64),
}

impl Field {
    pub fn across(&self, x: f64) -> f64 {
        self.left + (self.right - self.left) * (x - self.x.0) / (self.x.1 - self.x.0)
    }

    pub fn up(&self, y: f64) -> f64 {
        self.bottom - (self.bottom - self.top) * (y - self.y.0) / (self.y.1 - self.y.0)
    }
}

/// Draws the curves into a picture of this size, px.
pub fn curve(on: &mut dyn Painter, width: f64, height: f64, theme: Theme, what: &Curve) {
    let inks = theme.inks();
    let shown = &what.lines[..what.lines.len().min(4)];
    let set = Type { size: SMALL, bold: true, anchor: Anchor::Start, colour: inks.ink };
    let longest = shown.iter().map(|line| on.width_of(&line.name, set)).fold(0.0, f64::max);
    let labels = (longest + 12.0).min(0.32 * width);
    let end = what.times.last().copied().unwrap_or(1.0);
    let field = Field {
        left: 38.0,
        right: width - labels - 4.0,
        top: 22.0,
        bottom: height - 26.0,
        x: (0.0, end),
        y: extent(shown, &what.limits),
    };
    grid(on, &field, what, &inks);
    for (value, words) in &what.limits {
        limit(on, &field, *value, words, &inks);
    }
    for (i, line) in shown.iter().enumerate() {
        let points: Vec<(f64, f64)> =
            what.times.iter().zip(&line.values).map(|(t, v)| (field.across(*t), field.up(*v))).collect();
        on.line(&points, Stroke { colour: inks.lines[i], width: 2.2, dash: DASHES[i] });
    }
    if let Some(cursor) = what.cursor {
        let x = field.across(cursor.clamp(0.0, end));
        on.line(
            &[(x, field.top), (x, field.bottom)],
            Stroke { colour: inks.ink, width: 1.0, dash: &[2.0, 3.0] },
        );
    }
    marks(on, &field, what, &inks);
    name_lines(on, &field, shown, labels, &inks);
}

/// Room above and below everything that is drawn.
fn extent(lines: &[CurveLine], limits: &[(f64, String)]) -> (f64, f64) {
    let values = lines.iter().flat_map(|line| line.values.iter().copied());
    let all = values.chain(limits.iter().map(|limit| limit.0));
    let (low, high) =
        all.fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), v| (low.min(v), high.max(v)));
    let room = (0.06 * (high - low)).max(0.5);
    if low <= high { (low - room, high + room) } else { (0.0, 1.0) }
}

fn grid(on: &mut dyn Painter, field: &Field, what: &Curve, inks: &Inks) {
    let thin = Stroke { colour: inks.grid, width: 1.0, dash: &[] };
    let set = |anchor| Type { size: SMALL, bold: false, anchor, colour: inks.soft };
    degrees(on, field, what.unit, inks);
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let count = ((field.right - field.left) / 74.0).max(2.0) as usize;
    let mut free = f64::NEG_INFINITY;
    for (time, label) in time_ticks(field.x.1, count, what.clock) {
        let x = field.across(time);
        on.line(&[(x, field.top), (x, field.bottom)], thin);
        let half = 0.5 * on.width_of(&label, set(Anchor::Middle));
        if x - half < free || x + half > field.right + 40.0 {
            continue;
        }
        on.text((x.max(half), field.bottom + 17.0), &label, set(Anchor::Middle));
        free = x + half + 8.0;
    }
}

/// The axis of temperatures.
pub(super) fn degrees(on: &mut dyn Painter, field: &Field, unit: &str, inks: &Inks) {
    let thin = Stroke { colour: inks.grid, width: 1.0, dash: &[] };
    let set = |anchor| Type { size: SMALL, bold: false, anchor, colour: inks.soft };
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let count = ((field.bottom - field.top) / 38.0).max(2.0) as usize;
    let values = ticks(field.y.0, field.y.1, count);
    let step = if values.len() > 1 { values[1] - values[0] } else { 1.0 };
    for value in values {
        let y = field.up(value);
        on.line(&[(field.left, y), (field.right, y)], thin);
        on.text((field.left - 6.0, y + 4.0), &number(value, step), set(Anchor::End));
    }
    on.text((field.left - 6.0, field.top - 9.0), unit, set(Anchor::End));
}

fn limit(on: &mut dyn Painter, field: &Field, value: f64, words: &str, inks: &Inks) {
    let y = field.up(value);
    on.line(&[(field.left, y), (field.right, y)], Stroke { colour: inks.ink, width: 1.2, dash: &[6.0, 4.0] });
    let set = Type { size: SMALL, bold: false, anchor: Anchor::End, colour: inks.ink };
    let text = fitting(on, words, set, field.right - field.left - 12.0);
    on_paper(on, (field.right - 4.0, y - 5.0), &text, set, inks.paper);
}

/// Text on a piece of paper, so that no line runs through it.
fn on_paper(on: &mut dyn Painter, at: (f64, f64), text: &str, set: Type, paper: Colour) {
    let wide = on.width_of(text, set) + 4.0;
    let left = match set.anchor {
        Anchor::Start => at.0 - 2.0,
        Anchor::Middle => at.0 - 0.5 * wide,
        Anchor::End => at.0 - wide + 2.0,
    };
    rectangle(on, left, at.1 - set.size + 1.0, wide, set.size + 2.0, paper);
    on.text(at, text, set);
}

fn marks(on: &mut dyn Painter, field: &Field, what: &Curve, inks: &Inks) {
    let set = Type { size: SMALL, bold: true, anchor: Anchor::Middle, colour: inks.ink };
    let mut taken: Vec<(f64, f64)> = Vec::new();
    for (time, words) in &what.marks {
        let x = field.across(*time);
        on.line(&[(x, field.top), (x, field.bottom)], Stroke { colour: inks.ink, width: 1.6, dash: &[] });
        let text = fitting(on, words, set, field.right - field.left);
        let half = 0.5 * on.width_of(&text, set) + 3.0;
        let middle = x.clamp(field.left + half, (field.right - half).max(field.left + half));
        if taken.iter().any(|(from, to)| middle - half < *to && middle + half > *from) {
            continue;
        }
        taken.push((middle - half, middle + half));
        on.text((middle, field.top - 8.0), &text, set);
    }
}

fn name_lines(on: &mut dyn Painter, field: &Field, lines: &[CurveLine], room: f64, inks: &Inks) {
    let ends: Vec<f64> =
        lines.iter().map(|line| field.up(line.values.last().copied().unwrap_or(0.0))).collect();
    let places = spread(&ends, 16.0, field.top + 6.0, field.bottom - 2.0);
    for (i, line) in lines.iter().enumerate() {
        let set = Type { size: SMALL, bold: true, anchor: Anchor::Start, colour: inks.lines[i] };
        let text = fitting(on, &line.name, set, room - 8.0);
        let thin = Stroke { colour: inks.lines[i], width: 1.0, dash: &[] };
        on.line(&[(field.right, ends[i]), (field.right + 5.0, places[i])], thin);
        on.text((field.right + 8.0, places[i] + 4.0), &text, set);
    }
}
