//! A plot: an area with a temperature axis, and lines told apart by dash and marker.

use super::number::{Ticks, fixed};
use super::painter::{Anchor, Path, Point, Rect, Stroke, Weight};
use super::pen::Pen;

/// An area and what its edges stand for.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Plot {
    /// px
    pub area: Rect,
    /// At the left and the right edge.
    pub x: (f64, f64),
    /// At the bottom and the top edge.
    pub y: (f64, f64),
}

/// Distance of the numbers from the axis, px.
pub const AXIS_GAP: f64 = 8.0;
/// Least distance of two ticks, px.
const TICK_GAP: f64 = 34.0;

impl Plot {
    /// px
    pub fn x(&self, x: f64) -> f64 {
        self.area.left + (x - self.x.0) / (self.x.1 - self.x.0) * self.area.width()
    }

    /// px
    pub fn y(&self, y: f64) -> f64 {
        self.area.bottom - (y - self.y.0) / (self.y.1 - self.y.0) * self.area.height()
    }

    /// The points of a line, without what is no number or lies outside in x.
    pub fn points(&self, xs: &[f64], ys: &[f64]) -> Vec<Point> {
        let shown =
            |(x, y): &(&f64, &f64)| x.is_finite() && y.is_finite() && **x >= self.x.0 && **x <= self.x.1;
        xs.iter().zip(ys).filter(shown).map(|(x, y)| (self.x(*x), self.y(*y))).collect()
    }

    /// Grid lines and numbers of the temperature axis.
    pub fn draw_axis(&self, pen: &mut Pen, ticks: &Ticks) {
        let hand = pen.quiet(Anchor::End);
        for tick in &ticks.at {
            let y = self.y(*tick);
            pen.across(y, self.area.left, self.area.right, &Stroke::plain(pen.inks.grid, 1.0));
            pen.write(&ticks.label(*tick), (self.area.left - AXIS_GAP, y), &hand);
        }
        let axis = Stroke { opacity: 0.55, ..Stroke::plain(pen.inks.quiet, 1.0) };
        pen.across(self.area.bottom, self.area.left, self.area.right, &axis);
    }
}

/// The ticks of a temperature axis of this height, px.
pub fn temperature_ticks(y: (f64, f64), height: f64) -> Ticks {
    Ticks::apart(y.0, y.1, (y.1 - y.0) * TICK_GAP / height.max(TICK_GAP))
}

/// Width that the numbers of the temperature axis and its unit take up, whatever ticks it gets up to this height.
pub fn axis_width(pen: &Pen, y: (f64, f64), height: f64, unit: &str) -> f64 {
    let decimals = temperature_ticks(y, height).decimals;
    // In some fonts digits differ in width; most are as wide as a 0.
    let wide = |value: f64| {
        let digits = fixed(value, decimals).replace(|letter: char| letter.is_ascii_digit(), "0");
        pen.width(&digits, Weight::Regular)
    };
    wide(y.0).max(wide(y.1)).max(pen.width(unit, Weight::Regular)) + AXIS_GAP + 2.0
}

/// Dashes of the lines, in order.
const DASHES: [&[f64]; 6] =
    [&[], &[9.0, 4.0], &[2.0, 3.0], &[10.0, 3.0, 2.0, 3.0], &[5.0, 2.0], &[12.0, 3.0, 2.0, 3.0, 2.0, 3.0]];

/// The stroke of the n-th line.
pub fn line_stroke(pen: &Pen, number: usize) -> Stroke {
    let width = if number == 0 { 2.25 } else { 1.75 };
    Stroke { dash: DASHES[number % DASHES.len()], ..Stroke::plain(pen.inks.line(number), width) }
}

/// Distance of the markers of one line, px.
const MARKERS: f64 = 84.0;
/// Half the size of a marker, px.
const HALF: f64 = 3.6;

/// The marker of the n-th line: circle, square, triangle, diamond, triangle on its tip, upright bar.
pub fn draw_marker(pen: &mut Pen, (x, y): Point, number: usize) {
    let h = HALF;
    let outline = match number % 6 {
        0 => Path::circle((x, y), h),
        1 => Path::rect(Rect::new(x - 0.9 * h, y - 0.9 * h, 1.8 * h, 1.8 * h)),
        2 => Path::through(&[(x, y - 1.2 * h), (x + 1.1 * h, y + 0.8 * h), (x - 1.1 * h, y + 0.8 * h)])
            .closed(),
        3 => {
            Path::through(&[(x, y - 1.3 * h), (x + 1.3 * h, y), (x, y + 1.3 * h), (x - 1.3 * h, y)]).closed()
        }
        4 => Path::through(&[(x, y + 1.2 * h), (x + 1.1 * h, y - 0.8 * h), (x - 1.1 * h, y - 0.8 * h)])
            .closed(),
        _ => Path::rect(Rect::new(x - 0.5 * h, y - 1.2 * h, h, 2.4 * h)),
    };
    pen.fill(&outline, pen.inks.paper);
    pen.painter.stroke(&outline, &Stroke::plain(pen.inks.line(number), 1.5));
}

/// Markers along a line, set off from those of its neighbours.
pub fn draw_markers(pen: &mut Pen, line: &[Point], number: usize, lines: usize) {
    let (Some(first), Some(last)) = (line.first(), line.last()) else { return };
    let mut x = first.0 + MARKERS * (0.4 + number as f64 / lines.max(1) as f64);
    while x < last.0 - 2.0 * HALF {
        if let Some(y) = height_at(line, x) {
            draw_marker(pen, (x, y), number);
        }
        x += MARKERS;
    }
}

/// y of a line at x; none outside it.
pub fn height_at(line: &[Point], x: f64) -> Option<f64> {
    let after = line.partition_point(|point| point.0 < x);
    let b = line.get(after)?;
    let Some(a) = after.checked_sub(1).and_then(|before| line.get(before)) else {
        return (b.0 <= x).then_some(b.1);
    };
    Some(a.1 + (b.1 - a.1) * (x - a.0) / (b.0 - a.0))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_line_is_read_between_its_points() {
        let line = [(0.0, 10.0), (10.0, 20.0), (20.0, 0.0)];
        assert_eq!(height_at(&line, 5.0), Some(15.0));
        assert_eq!(height_at(&line, 0.0), Some(10.0));
        assert_eq!(height_at(&line, 20.0), Some(0.0));
        assert_eq!([height_at(&line, -1.0), height_at(&line, 21.0), height_at(&[], 1.0)], [None; 3]);
    }

    #[test]
    fn points_that_are_no_numbers_are_left_out() {
        let plot = Plot { area: Rect::new(0.0, 0.0, 100.0, 100.0), x: (0.0, 10.0), y: (0.0, 100.0) };
        let points = plot.points(&[0.0, 5.0, 10.0, 11.0], &[0.0, f64::NAN, 100.0, 50.0]);
        assert_eq!(points, [(0.0, 100.0), (100.0, 0.0)]);
    }
}
