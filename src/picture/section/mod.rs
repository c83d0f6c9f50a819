//! The item cut open: layers to scale, shaded by temperature.

mod cut;
mod round;
mod rows;
mod scale_bar;
mod slab;

use super::Picture;
use super::layers::LayerColumns;
use super::number::{Ticks, span, tenths};
use super::painter::{Anchor, Painter, Rect, Stroke, Weight};
use super::palette::Inks;
use super::pen::{Pen, font_size};
use super::table::Table;
use cut::Cut;
use rows::Row;

/// The outline across the layers.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Outline<'a> {
    /// Flat layers.
    Slab,
    /// Around an axis.
    Cylinder {
        /// What is left free inside, if anything.
        hollow: Option<Hollow<'a>>,
    },
    /// Around a point.
    Sphere {
        /// What is left free inside, if anything.
        hollow: Option<Hollow<'a>>,
    },
}

/// The hollow inside of a cylinder or sphere.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Hollow<'a> {
    /// Its radius, in the unit of the layers.
    pub radius: f64,
    /// Its radius in words, "50 mm".
    pub words: &'a str,
}

impl<'a> Outline<'a> {
    fn hollow(self) -> Option<Hollow<'a>> {
        match self {
            Self::Slab => None,
            Self::Cylinder { hollow } | Self::Sphere { hollow } => hollow,
        }
    }
}

/// The item cut open at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Section<'a> {
    /// Flat or round.
    pub outline: Outline<'a>,
    /// From the inside out.
    pub layers: &'a [LayerColumns<'a>],
    /// Temperatures at the cold and the hot end of the colours.
    pub scale: (f64, f64),
    /// Unit of the temperatures, "°C".
    pub unit: &'a str,
    /// The moment in words, "Mon 09:10".
    pub when: &'a str,
}

/// Distance from one row of text to the next, as part of the font size.
const PITCH: f64 = 1.4;
/// Room for leader lines between the cut and the text, px.
const LEADERS: f64 = 30.0;
/// Room around, so that no line is cut in half, px.
const EDGE: f64 = 1.0;
/// Gap between the picture and the scale below it, px.
const BELOW: f64 = 14.0;

/// Where things go.
struct Layout {
    /// Room for the item itself.
    item: Rect,
    /// Left end of the text.
    text: f64,
    /// Right end of the picture.
    right: f64,
    /// Distance between rows.
    pitch: f64,
}

/// The colours never stand for less than this, in degrees.
const LEAST_SPAN: f64 = 1.0;

impl Section<'_> {
    /// The temperatures at the ends of the colours, apart from each other whatever was given.
    fn scale(&self) -> (f64, f64) {
        span([self.scale.0, self.scale.1].into_iter(), 0.0, LEAST_SPAN)
    }

    fn thickness(&self) -> f64 {
        self.layers.iter().map(|layer| layer.thickness).sum()
    }

    /// Isotherms worth drawing: (temperature; px along the cut), none crowding a side of a layer or another.
    fn isotherms(cut: &Cut, ticks: &Ticks) -> Vec<(f64, f64)> {
        /// px
        const GAP: f64 = 5.0;
        let mut lines: Vec<(f64, f64)> =
            ticks.at.iter().flat_map(|t| cut.passes(*t).into_iter().map(|px| (*t, px))).collect();
        lines.sort_by(|a, b| a.1.total_cmp(&b.1));
        let mut kept: Vec<(f64, f64)> = Vec::new();
        for line in lines {
            let free = cut.at.iter().all(|side| (side - line.1).abs() > GAP);
            if free && kept.last().is_none_or(|before| line.1 - before.1 > GAP) {
                kept.push(line);
            }
        }
        kept
    }

    /// What stands below the scale.
    fn notes(&self, cut: &Cut, isotherms: bool, ticks: &Ticks) -> String {
        let mut notes = Vec::new();
        if isotherms {
            notes.push(format!("Dashed: every {} {}.", ticks.label(ticks.step), self.unit));
        }
        if cut.widened.contains(&true) {
            notes.push("* Drawn thicker.".to_owned());
        }
        notes.join("  ")
    }

    fn layout(&self, pen: &Pen, rows: &[Row], width: f64, bottom: f64) -> Layout {
        let widest = rows.iter().map(|row| row_width(pen, row)).fold(0.0, f64::max);
        let room = Rect { left: EDGE, top: EDGE, right: width - EDGE, bottom };
        let most = match self.outline {
            Outline::Slab => 1.5 * room.height(),
            Outline::Cylinder { .. } | Outline::Sphere { .. } => room.height(),
        };
        let text = widest.min((0.52 * width).max(width - most - LEADERS));
        let item = most.min(room.right - text - LEADERS - room.left);
        Layout {
            item: Rect { right: room.left + item, ..room },
            text: room.left + item + LEADERS,
            right: room.right,
            pitch: (PITCH * pen.size).round(),
        }
    }
}

/// Draws the text of a row with its middle line at `y`.
fn write_row(pen: &mut Pen, row: &Row, layout: &Layout, y: f64) {
    let mut x = layout.text;
    let strong = pen.strong(Anchor::Start);
    if !row.strong.is_empty() {
        pen.write(&row.strong, (x, y), &strong);
        x += pen.width(&row.strong, Weight::Bold);
    }
    let quiet = pen.quiet(Anchor::Start);
    let left = layout.right - x - pen.width(&row.rest, Weight::Regular);
    if row.name.is_empty() {
        if left >= 0.0 && !row.rest.is_empty() {
            // A font may be narrower than measured: begin the second text a gap after the first.
            pen.write(row.rest.trim_start(), (x + pen.width(" ", Weight::Bold), y), &quiet);
        }
        return;
    }
    let name = pen.shortened(&row.name, left, Weight::Regular);
    let ink = super::pen::Hand { colour: pen.inks.ink, ..quiet };
    pen.write(&format!("{name}{}", row.rest), (x, y), &ink);
}

fn row_width(pen: &Pen, row: &Row) -> f64 {
    pen.width(&row.strong, Weight::Bold)
        + pen.width(&row.name, Weight::Regular)
        + pen.width(&row.rest, Weight::Regular)
        + 2.0
}

/// The line along a side of a layer, on shading of this temperature.
fn side_stroke(inks: &Inks, section: &Section, temperature: f64) -> Stroke {
    let (cold, hot) = section.scale();
    let place = (temperature - cold) / (hot - cold);
    Stroke { colour: inks.ramp(place).ink_on(), opacity: 0.8, width: 1.0, dash: &[] }
}

/// The line along an isotherm.
fn isotherm_stroke(inks: &Inks, section: &Section, temperature: f64) -> Stroke {
    Stroke { opacity: 0.6, dash: &[3.0, 3.0], ..side_stroke(inks, section, temperature) }
}

impl Picture for Section<'_> {
    fn title(&self) -> String {
        format!("Section, {}", self.when)
    }

    fn description(&self) -> String {
        let shape = match self.outline {
            Outline::Slab => "Slab",
            Outline::Cylinder { .. } => "Cylinder",
            Outline::Sphere { .. } => "Sphere",
        };
        let layers: Vec<String> = self
            .layers
            .iter()
            .map(|layer| {
                let (a, b) = (tenths(layer.inside()), tenths(layer.outside()));
                let between = if a == b { a } else { format!("{a} to {b}") };
                format!("{}, {}: {between} {}", layer.name, layer.thickness_words, self.unit)
            })
            .collect();
        format!("{shape} cut open, from the inside out. {}.", layers.join("; "))
    }

    fn height(&self, width: f64) -> f64 {
        let pitch = (PITCH * font_size(width)).round();
        let rows = (rows::count(self) as f64 + 0.5) * pitch;
        rows.max((0.5 * width).clamp(150.0, 260.0)).round() + BELOW + scale_bar::HEIGHT + pitch
    }

    fn draw(&self, painter: &mut dyn Painter, inks: &Inks, width: f64, height: f64) {
        let mut pen = Pen::new(painter, inks, width);
        if self.layers.is_empty() {
            return;
        }
        let pitch = (PITCH * pen.size).round();
        let ticks = scale_bar::ticks(&pen, self.scale(), width);
        let bottom = height - BELOW - scale_bar::HEIGHT - pitch;
        let most = (bottom / pitch).floor().max(2.0);
        // Few rows by construction.
        #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
        let most = most as usize;
        let first = Cut::new(self.layers, 0.0, 100.0);
        let layout = self.layout(&pen, &rows::rows(self, &first, most), width, bottom);
        let (cut, dashed) = match self.outline {
            Outline::Slab => slab::draw(&mut pen, self, &layout, &ticks, most),
            Outline::Cylinder { .. } | Outline::Sphere { .. } => {
                round::draw(&mut pen, self, &layout, &ticks, most)
            }
        };
        scale_bar::draw(&mut pen, self.scale(), &ticks, self.unit, EDGE, bottom + BELOW, width);
        let notes = self.notes(&cut, dashed, &ticks);
        let notes = pen.shortened(&notes, width - 2.0 * EDGE, Weight::Regular);
        if !notes.is_empty() {
            let hand = pen.quiet(Anchor::Start);
            pen.write(&notes, (EDGE, bottom + BELOW + scale_bar::HEIGHT + 0.5 * pitch), &hand);
        }
    }

    fn table(&self) -> Table {
        let unit = self.unit;
        Table {
            caption: format!("Temperatures through the layers, {}", self.when),
            columns: ["Layer".to_owned(), "Thickness".to_owned()]
                .into_iter()
                .chain(["Inner side", "Outer side"].map(|side| format!("{side}, {unit}")))
                .collect(),
            rows: self
                .layers
                .iter()
                .map(|layer| {
                    let ends = [layer.inside(), layer.outside()].map(tenths);
                    let words = [layer.name.to_owned(), layer.thickness_words.to_owned()];
                    words.into_iter().chain(ends).collect()
                })
                .collect(),
        }
    }
}

#[cfg(test)]
mod tests;
