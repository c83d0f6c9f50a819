//! Pictures: columns of numbers onto a painter.
//!
//! Each picture is a struct of plain columns, in the units that are shown, and is a [`Picture`]: it draws itself at
//! a given size, says in words what it shows, and gives its numbers as a table. Drawing knows no scenario and no
//! answer; `gather` alone makes the columns from one.

mod colour;
mod curve;
mod free;
mod gather;
mod layers;
mod number;
mod painter;
mod palette;
mod pen;
mod plot;
mod profile;
mod section;
mod spread;
mod svg;
mod table;
#[cfg(test)]
mod testing;
mod time_axis;
mod widths;

pub use colour::Colour;
pub use curve::{Cursor, Curve, CurveLine, Event, EventKind, Limit};
pub use gather::Shown;
pub use layers::LayerColumns;
pub use painter::{
    Anchor, Fill, Painter, Path, Point, RIM, Rect, Step, Stroke, TextStyle, Weight, on_circle,
};
pub use palette::{Inks, Theme};
pub use profile::Profile;
pub use section::{Hollow, Outline, Section};
pub use svg::SvgPainter;
pub use table::Table;

use crate::Solved;
use crate::answer::Outcome;
use crate::units::quantity::System;

/// The pictures there are.
pub const NAMES: [&str; 3] = ["section", "curve", "profile"];

/// Something that can be drawn, described and tabled.
pub trait Picture {
    /// What it is, in a few words.
    fn title(&self) -> String;

    /// What there is to see, in a sentence or two, for those who cannot.
    fn description(&self) -> String;

    /// The height it looks best at, CSS pixels, for a width.
    fn height(&self, width: f64) -> f64;

    /// Draws it into the box from (0, 0) to (`width`, `height`), CSS pixels; 240 by 120 or more.
    fn draw(&self, painter: &mut dyn Painter, inks: &Inks, width: f64, height: f64);

    /// The numbers behind it.
    fn table(&self) -> Table;
}

/// A picture as a standalone SVG file, on the paper of its theme. `id` begins every id in it.
pub fn svg(picture: &dyn Picture, theme: Theme, id: &str, width: f64, height: f64) -> String {
    let inks = theme.inks();
    let mut painter = SvgPainter::new(id, width, height);
    let paper = Fill::Plain { colour: inks.paper, opacity: 1.0 };
    painter.fill(&Path::rect(Rect::new(0.0, 0.0, width, height)), &paper);
    picture.draw(&mut painter, inks, width, height);
    painter.finish(&picture.title(), &picture.description())
}

/// Draws one of the pictures at a moment, s; an unknown name draws nothing.
pub fn draw(on: &mut dyn Painter, name: &str, size: (f64, f64), theme: Theme, shown: &Shown<'_>, time: f64) {
    shown.picture(name, time, &mut |picture| picture.draw(on, theme.inks(), size.0, size.1));
}

/// The height a picture looks best at, CSS pixels, for a width; 0 for an unknown name.
pub fn height(name: &str, width: f64, shown: &Shown<'_>) -> f64 {
    let mut height = 0.0;
    shown.picture(name, 0.0, &mut |picture| height = picture.height(width));
    height
}

/// What there is to see in one of the pictures at a moment, s, in words.
pub fn description(name: &str, shown: &Shown<'_>, time: f64) -> String {
    let mut words = String::new();
    shown.picture(name, time, &mut |picture| words = picture.description());
    words
}

/// The numbers of one of the pictures at a moment, s.
pub fn table(name: &str, shown: &Shown<'_>, time: f64) -> Table {
    let mut table = Table::default();
    shown.picture(name, time, &mut |picture| table = picture.table());
    table
}

/// All pictures of an answer as (name, SVG), at the moment that was asked for.
pub fn sheets(solved: &Solved) -> Vec<(&'static str, String)> {
    let shown = Shown::new(solved, System::Metric);
    let asked = [&solved.report.ready, &solved.report.standing].into_iter().flatten();
    let mut times = asked.filter_map(|outcome| match outcome {
        Outcome::At { time_s, .. } => Some(*time_s),
        Outcome::Already { .. } | Outcome::Never { .. } | Outcome::NotWithin { .. } => None,
    });
    let time = times.next().unwrap_or(0.0).min(shown.end());
    let mut sheets = Vec::new();
    for (name, width) in NAMES.into_iter().zip([480.0, 720.0, 720.0]) {
        shown.picture(name, time, &mut |picture| {
            sheets.push((name, svg(picture, Theme::Light, name, width, picture.height(width))));
        });
    }
    sheets
}
