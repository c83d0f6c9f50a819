//! Pictures: one drawing code behind a small painter trait.
//!
//! Drawing takes columns of numbers and a painter and knows no scenario; `gather` makes the columns.

mod axis;
mod curve;
mod gather;
mod painter;
mod palette;
mod profile;
mod section;
mod svg;
mod table;

pub use curve::{Curve, CurveLine, curve};
pub use gather::Shown;
pub use painter::{Anchor, Colour, Painter, Stroke, Type};
pub use palette::{Theme, ramp};
pub use profile::{Profile, ProfileLayer, profile};
pub use section::{Outline, Section, SectionLayer, section};
pub use svg::Svg;
pub use table::Table;

use crate::Solved;
use crate::answer::Outcome;
use crate::units::quantity::System;

/// The pictures there are.
pub const NAMES: [&str; 3] = ["section", "curve", "profile"];

/// Draws one of the pictures at a moment, s; an unknown name draws nothing.
pub fn draw(on: &mut dyn Painter, name: &str, size: (f64, f64), theme: Theme, shown: &Shown<'_>, time: f64) {
    let now = shown.temperatures(time);
    match name {
        "section" => section(on, size.0, size.1, theme, &shown.section(&now)),
        "curve" => curve(on, size.0, size.1, theme, &shown.curve(Some(time))),
        "profile" => {
            let start = shown.temperatures(0.0);
            profile(on, size.0, size.1, theme, &shown.profile(&now, &start));
        }
        _ => {}
    }
}

/// The numbers of one of the pictures at a moment, s.
pub fn table(name: &str, shown: &Shown<'_>, time: f64) -> Table {
    match name {
        "curve" => shown.curve_table(),
        "section" => shown.places_table(time, "The item cut open"),
        _ => shown.places_table(time, "From the inside to the outside"),
    }
}

/// One picture as SVG on light paper.
pub fn as_svg(name: &str, size: (f64, f64), shown: &Shown<'_>, time: f64) -> String {
    let mut on = Svg::new(size.0, size.1, &table(name, shown, time).caption, Theme::Light.inks().paper);
    draw(&mut on, name, size, Theme::Light, shown, time);
    on.finish()
}

/// All pictures of an answer as (name, SVG), at the moment that was asked for.
pub fn sheets(solved: &Solved) -> Vec<(&'static str, String)> {
    let shown = Shown::new(solved, System::Metric);
    let asked = [&solved.report.ready, &solved.report.standing].into_iter().flatten();
    let time = asked.filter_map(|outcome| match outcome {
        Outcome::At { time_s, .. } => Some(*time_s),
        Outcome::Already { .. } | Outcome::Never { .. } | Outcome::NotWithin { .. } => None,
    });
    let time = time.fold(None, |first, time| first.or(Some(time))).unwrap_or(0.0).min(shown.end());
    let sizes = [(460.0, 340.0), (720.0, 360.0), (720.0, 260.0)];
    NAMES.iter().zip(sizes).map(|(name, size)| (*name, as_svg(name, size, &shown, time))).collect()
}
