//! A cylinder or a sphere cut open: a quarter of it, or of a wide ring only a piece of the wall.

use super::super::colour::Colour;
use super::super::number::Ticks;
use super::super::painter::{Fill, Path, Point, Rect, Stroke, on_circle};
use super::super::pen::Pen;
use super::super::spread::spread;
use super::cut::Cut;
use super::rows::{Row, rows};
use super::{Layout, Section, isotherm_stroke, side_stroke, write_row};
use std::f64::consts::FRAC_PI_2;

/// Up to this part of the outer radius a hollow is drawn whole; beyond it only the wall is drawn.
const WIDE_HOLLOW: f64 = 0.6;
/// A circle of this radius looks straight, px.
const FLAT: f64 = 20_000.0;
/// Upwards, where the cut is.
const UP: f64 = 3.0 * FRAC_PI_2;

/// Where the round goes.
struct Wedge {
    centre: Point,
    /// Radius of the hollow, px; 0 when solid.
    inner: f64,
    /// px
    outer: f64,
    /// Angle from the cut on, to the left.
    angle: f64,
}

impl Wedge {
    /// A quarter, or the wall alone where the hollow is wide.
    fn new(section: &Section, item: Rect) -> Self {
        let radius = section.outline.hollow().map_or(0.0, |hollow| hollow.radius);
        let free = radius / (radius + section.thickness());
        if free <= WIDE_HOLLOW {
            let outer = item.width().min(item.height());
            let bottom = 0.5 * (item.top + item.bottom + outer);
            return Self { centre: (item.right, bottom), inner: free * outer, outer, angle: FRAC_PI_2 };
        }
        let mut wall = 0.72 * item.height();
        loop {
            let outer = (wall / (1.0 - free)).min(FLAT);
            let angle = libm::asin((item.width() / outer).min(1.0));
            let inner = outer - wall;
            let height = outer - inner * libm::cos(angle);
            if height <= item.height() || wall < 20.0 {
                return Self { centre: (item.right, item.top + outer), inner, outer, angle };
            }
            wall *= 0.96;
        }
    }

    fn arc(&self, radius: f64) -> Path {
        Path::default().arc(self.centre, radius, UP - self.angle, UP)
    }

    /// The ring from `inner` to `outer`.
    fn outline(&self) -> Path {
        let path = self.arc(self.outer);
        if self.inner > 0.0 {
            path.arc(self.centre, self.inner, UP, UP - self.angle).closed()
        } else {
            path.line(self.centre).closed()
        }
    }
}

/// Draws the round and its rows; the cut, and whether there are isotherms.
pub fn draw(pen: &mut Pen, section: &Section, layout: &Layout, ticks: &Ticks, most: usize) -> (Cut, bool) {
    let wedge = Wedge::new(section, layout.item);
    let cut = Cut::new(section.layers, wedge.inner, wedge.outer);
    let isotherms = Section::isotherms(&cut, ticks);
    let stops: Vec<(f64, Colour)> = cut
        .stops(pen.inks, section.scale())
        .into_iter()
        .map(|(px, colour)| (px / wedge.outer, colour))
        .collect();
    let fill = Fill::Radial { centre: wedge.centre, radius: wedge.outer, stops: &stops };
    pen.painter.fill(&wedge.outline(), &fill);
    for (t, px) in &isotherms {
        pen.painter.stroke(&wedge.arc(*px), &isotherm_stroke(pen.inks, section, *t));
    }
    for (number, px) in cut.at.iter().enumerate().take(section.layers.len()).skip(1) {
        let stroke = side_stroke(pen.inks, section, section.layers[number].inside());
        pen.painter.stroke(&wedge.arc(*px), &stroke);
    }
    if wedge.inner > 0.0 && wedge.angle >= FRAC_PI_2 {
        hollow_sides(pen, &wedge);
    }
    pen.painter.stroke(&wedge.outline(), &Stroke::plain(pen.inks.ink, 1.0));
    write_rows(pen, layout, &wedge, &rows(section, &cut, most));
    (cut, !isotherms.is_empty())
}

/// The cut through the hollow, faint, to the axis or centre.
fn hollow_sides(pen: &mut Pen, wedge: &Wedge) {
    let left = on_circle(wedge.centre, wedge.inner, UP - wedge.angle);
    let top = on_circle(wedge.centre, wedge.inner, UP);
    let stroke = Stroke { dash: &[2.0, 3.0], ..Stroke::plain(pen.inks.quiet, 1.0) };
    pen.painter.stroke(&Path::through(&[left, wedge.centre, top]), &stroke);
}

/// Rows to the right of the cut, each with a line to its place on it; lines never cross.
fn write_rows(pen: &mut Pen, layout: &Layout, wedge: &Wedge, rows: &[Row]) {
    let places: Vec<f64> = rows.iter().map(|row| wedge.centre.1 - row.along).collect();
    let sizes = vec![layout.pitch; rows.len()];
    let middles = spread(&places, &sizes, layout.item.top, layout.item.bottom);
    let stroke = Stroke::plain(pen.inks.quiet, 1.0);
    for ((row, from), to) in rows.iter().zip(places).zip(middles) {
        let (cut, text) = (wedge.centre.0, layout.text - 6.0);
        let line = [(cut + 1.0, from), (cut + 7.0, from), (text - 6.0, to), (text, to)];
        pen.painter.stroke(&Path::through(&line), &stroke);
        write_row(pen, row, layout, to);
    }
}
