//! The bar that says which temperature a colour is.

use super::super::number::Ticks;
use super::super::painter::{Anchor, Fill, Path, Rect, Stroke, Weight};
use super::super::pen::Pen;
use super::super::spread::{fits, spread};

/// Height of bar, ticks and numbers, px.
pub const HEIGHT: f64 = 34.0;

const BAR: f64 = 10.0;
const WIDEST: f64 = 340.0;
/// Least gap between two numbers, px.
const GAP: f64 = 10.0;

/// The ticks of a bar in a picture of this width.
pub fn ticks(pen: &Pen, scale: (f64, f64), width: f64) -> Ticks {
    let length = length(pen, width, "");
    let mut most = 7;
    loop {
        let ticks = Ticks::round(scale.0, scale.1, most);
        let sizes = sizes(pen, &ticks);
        let step = length * ticks.step / (scale.1 - scale.0);
        if most <= 2 || (fits(&sizes, 0.0, length) && sizes.iter().all(|size| *size <= step)) {
            return ticks;
        }
        most -= 1;
    }
}

/// Draws it from (`left`, `top`) on.
pub fn draw(pen: &mut Pen, scale: (f64, f64), ticks: &Ticks, unit: &str, left: f64, top: f64, width: f64) {
    let bar = Rect::new(left, top, length(pen, width, unit) - left, BAR);
    let stops: Vec<(f64, _)> =
        (0_u8..=16).map(|i| f64::from(i) / 16.0).map(|place| (place, pen.inks.ramp(place))).collect();
    let fill = Fill::Linear { from: (bar.left, top), to: (bar.right, top), stops: &stops };
    pen.painter.fill(&Path::rect(bar), &fill);
    let at: Vec<f64> =
        ticks.at.iter().map(|t| bar.left + bar.width() * (t - scale.0) / (scale.1 - scale.0)).collect();
    for x in &at {
        pen.upright(*x, bar.bottom, bar.bottom + 4.0, &Stroke::plain(pen.inks.quiet, 1.0));
    }
    let middles = spread(&at, &sizes(pen, ticks), 0.0, bar.right + 0.5 * GAP);
    let hand = pen.quiet(Anchor::Middle);
    for (tick, x) in ticks.at.iter().zip(middles) {
        pen.write(&ticks.label(*tick), (x, bar.bottom + 14.0), &hand);
    }
    pen.write(unit, (bar.right + 8.0, top + 0.5 * BAR), &pen.quiet(Anchor::Start));
}

fn length(pen: &Pen, width: f64, unit: &str) -> f64 {
    (width - pen.width(unit, Weight::Regular) - 12.0).min(WIDEST)
}

fn sizes(pen: &Pen, ticks: &Ticks) -> Vec<f64> {
    ticks.at.iter().map(|tick| pen.width(&ticks.label(*tick), Weight::Regular) + GAP).collect()
}
