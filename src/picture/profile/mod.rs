//! Temperature through the layers at one time, and at the start.

mod bands;

use super::Picture;
use super::free::Taken;
use super::layers::{LayerColumns, sides};
use super::number::{Ticks, fixed, span, tenths};
use super::painter::{Anchor, Painter, Path, Point, Rect, Stroke, Weight};
use super::palette::Inks;
use super::pen::{Hand, Pen};
use super::plot::{AXIS_GAP, Plot, axis_width, temperature_ticks};
use super::table::Table;

/// Temperature through the layers.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Profile<'a> {
    /// From the inside out, with the temperatures at the moment shown.
    pub layers: &'a [LayerColumns<'a>],
    /// The same layers with the temperatures at the start; empty: not shown.
    pub start: &'a [LayerColumns<'a>],
    /// Temperatures at the bottom and the top: of the whole course, so that nothing jumps when the time moves.
    pub scale: (f64, f64),
    /// Unit of the temperatures, "°C".
    pub unit: &'a str,
    /// What the places count, "mm from the axis".
    pub places: &'a str,
    /// The moment in words, "Mon 09:10".
    pub when: &'a str,
}

/// Space above and below what is drawn, as part of its range.
const PAD: f64 = 0.06;
/// No temperature axis shows less than this, in degrees.
const LEAST_SPAN: f64 = 2.0;
/// Distance from one row of text to the next, as part of the font size.
const PITCH: f64 = 1.45;
/// Gap between two numbers of the axis of places, px.
const GAP: f64 = 14.0;

impl Profile<'_> {
    fn plot(&self, pen: &Pen, width: f64, height: f64) -> Plot {
        let pitch = pitch(pen);
        let values =
            self.layers.iter().chain(self.start).flat_map(|layer| layer.temperatures.iter().copied());
        let y = span(values.chain([self.scale.0, self.scale.1]), PAD, LEAST_SPAN);
        let top = pitch + bands::LEAD + 8.0;
        let bottom = height - 8.0 - 2.0 * pitch;
        let left = axis_width(pen, y, bottom - top, self.unit);
        let end = sides(self.layers).last().copied().unwrap_or(1.0);
        let area = Rect { left, right: width - 10.0, top, bottom };
        Plot { area, x: (0.0, if end > 0.0 { end } else { 1.0 }), y }
    }

    /// Round places with room for their numbers.
    fn place_ticks(pen: &Pen, plot: &Plot) -> Ticks {
        let mut least = (plot.x.1 - plot.x.0) / 10.0;
        loop {
            let ticks = Ticks::apart(plot.x.0, plot.x.1, least);
            let room = ticks.step / (plot.x.1 - plot.x.0) * plot.area.width() - GAP;
            let fits = |tick: &f64| pen.width(&ticks.label(*tick), Weight::Regular) <= room;
            if ticks.at.iter().all(fits) || ticks.at.len() <= 2 {
                return ticks;
            }
            least = 1.5 * ticks.step;
        }
    }

    fn draw_places(&self, pen: &mut Pen, plot: &Plot, width: f64) {
        let pitch = pitch(pen);
        let hand = pen.quiet(Anchor::Middle);
        let ticks = Self::place_ticks(pen, plot);
        let mark = Stroke { opacity: 0.55, ..Stroke::plain(pen.inks.quiet, 1.0) };
        let first = plot.area.bottom + 6.0 + 0.5 * pitch;
        for tick in &ticks.at {
            let (x, label) = (plot.x(*tick), ticks.label(*tick));
            pen.upright(x, plot.area.bottom, plot.area.bottom + 5.0, &mark);
            if pen.text_box(&label, (x, first), &hand).right <= width {
                pen.write(&label, (x, first), &hand);
            }
        }
        let title = pen.shortened(self.places, plot.area.width(), Weight::Regular);
        if !title.is_empty() {
            pen.write(&title, (0.5 * (plot.area.left + plot.area.right), first + pitch), &hand);
        }
    }
}

fn pitch(pen: &Pen) -> f64 {
    (PITCH * pen.size).round()
}

/// One line per layer, and what they are joined by where the temperature jumps.
struct Course {
    lines: Vec<Vec<Point>>,
    jumps: Vec<[Point; 2]>,
}

impl Course {
    fn new(plot: &Plot, layers: &[LayerColumns]) -> Self {
        let lines: Vec<Vec<Point>> =
            layers.iter().zip(sides(layers)).map(|(layer, begin)| line(plot, layer, begin)).collect();
        let joined = |pair: &[Vec<Point>]| {
            let (&a, &b) = (pair[0].last()?, pair[1].first()?);
            ((a.1 - b.1).abs() > 0.5).then_some([a, b])
        };
        let jumps = lines.windows(2).filter_map(joined).collect();
        Self { lines, jumps }
    }
}

/// The line of a layer from its inner to its outer side.
fn line(plot: &Plot, layer: &LayerColumns, begin: f64) -> Vec<Point> {
    let points: Vec<(f64, f64)> = layer.points(begin).collect();
    let (Some(first), Some(last)) = (points.first(), points.last()) else { return Vec::new() };
    let ends = [(begin, first.1), (begin + layer.thickness, last.1)];
    let all = std::iter::once(&ends[0]).chain(&points).chain(std::iter::once(&ends[1]));
    all.map(|(place, t)| (plot.x(*place), plot.y(*t))).collect()
}

/// Draws a course: solid lines, dotted where it jumps.
fn draw_course(pen: &mut Pen, course: &Course, stroke: &Stroke) {
    for line in &course.lines {
        pen.painter.stroke(&Path::through(line), stroke);
    }
    let jump = Stroke { dash: &[1.5, 2.5], width: 1.5, ..*stroke };
    for [a, b] in &course.jumps {
        pen.painter.stroke(&Path::through(&[*a, *b]), &jump);
        for end in [a, b] {
            pen.fill(&Path::circle(*end, 2.5), stroke.colour);
        }
    }
}

/// Writes the name of a course beside it, where it covers least.
fn name_course(pen: &mut Pen, plot: &Plot, course: &Course, words: &str, hand: Hand, taken: &mut Taken) {
    let words = pen.shortened(words, plot.area.width() - 12.0, hand.weight);
    if words.is_empty() {
        return;
    }
    let off = 0.5 * pen.size + 6.0;
    let points: Vec<Point> = course.lines.iter().flatten().copied().collect();
    let at_part = |part: f64| {
        let x = plot.area.left + plot.area.width() * part;
        let nearest = points.iter().min_by(|a, b| (a.0 - x).abs().total_cmp(&(b.0 - x).abs()));
        nearest.map(|point| (x, point.1))
    };
    let parts = (1..=14).map(|i| f64::from(i) / 16.0);
    let places: Vec<(Point, Rect)> = parts
        .filter_map(at_part)
        .flat_map(|(x, y)| [(x, y - off), (x, y + off), (x, y - 1.7 * off), (x, y + 1.7 * off)])
        .map(|at| (at, pen.text_box(&words, at, &hand)))
        .collect();
    if let Some(at) = taken.best(places.into_iter(), &plot.area) {
        pen.write(&words, at, &hand);
    }
}

impl Picture for Profile<'_> {
    fn title(&self) -> String {
        format!("Through the layers, {}", self.when)
    }

    fn description(&self) -> String {
        let part = |layer: &LayerColumns| {
            let (a, b) = (tenths(layer.inside()), tenths(layer.outside()));
            format!("{} from {a} to {b} {}", layer.name, self.unit)
        };
        let parts: Vec<String> = self.layers.iter().map(part).collect();
        format!("Temperature through the layers from the inside out: {}.", parts.join("; "))
    }

    fn height(&self, width: f64) -> f64 {
        (0.48 * width).clamp(240.0, 330.0).round()
    }

    fn draw(&self, painter: &mut dyn Painter, inks: &Inks, width: f64, height: f64) {
        let mut pen = Pen::new(painter, inks, width);
        let plot = self.plot(&pen, width, height);
        let row = 0.5 * pitch(&pen);
        bands::draw(&mut pen, &plot, self.layers);
        plot.draw_axis(&mut pen, &temperature_ticks(plot.y, plot.area.height()));
        bands::draw_sides(&mut pen, &plot, self.layers);
        let left = pen.width(self.unit, Weight::Regular) + 2.0 * AXIS_GAP;
        bands::draw_names(&mut pen, &plot, self.layers, row, left, width);
        let hand = pen.quiet(Anchor::End);
        pen.write(self.unit, (plot.area.left - AXIS_GAP, row), &hand);
        let (start, now) = (Course::new(&plot, self.start), Course::new(&plot, self.layers));
        let faint = Stroke { dash: &[5.0, 4.0], ..Stroke::plain(inks.quiet, 1.25) };
        draw_course(&mut pen, &start, &faint);
        draw_course(&mut pen, &now, &Stroke::plain(inks.line(0), 2.25));
        let mut taken = Taken::default();
        for line in start.lines.iter().chain(&now.lines) {
            taken.spare(line);
        }
        let rimmed = Hand { rim: true, ..pen.strong(Anchor::Middle) };
        name_course(&mut pen, &plot, &now, self.when, rimmed, &mut taken);
        if !self.start.is_empty() {
            let quiet = Hand { rim: true, ..pen.quiet(Anchor::Middle) };
            name_course(&mut pen, &plot, &start, "start", quiet, &mut taken);
        }
        self.draw_places(&mut pen, &plot, width);
    }

    fn table(&self) -> Table {
        let unit = self.unit;
        let mut columns = vec!["Layer".to_owned(), self.places.to_owned(), format!("{}, {unit}", self.when)];
        if !self.start.is_empty() {
            columns.push(format!("Start, {unit}"));
        }
        let mut rows = Vec::new();
        for (number, (layer, begin)) in self.layers.iter().zip(sides(self.layers)).enumerate() {
            for part in [0.0, 0.5, 1.0] {
                let place = begin + part * layer.thickness;
                let mut row = vec![layer.name.to_owned(), fixed(place, 1), tenths(at(layer, begin, place))];
                if let Some(start) = self.start.get(number) {
                    row.push(tenths(at(start, begin, place)));
                }
                row.resize(columns.len(), String::new());
                rows.push(row);
            }
        }
        Table { caption: format!("Temperature through the layers, {}", self.when), columns, rows }
    }
}

/// Temperature at a place of a layer, straight between its points; NaN where it has none.
fn at(layer: &LayerColumns, begin: f64, place: f64) -> f64 {
    let points: Vec<Point> = layer.points(begin).collect();
    let ends = (points.first().map_or(f64::NAN, |p| p.1), points.last().map_or(f64::NAN, |p| p.1));
    let middle = begin + 0.5 * layer.thickness;
    super::plot::height_at(&points, place).unwrap_or(if place < middle { ends.0 } else { ends.1 })
}

#[cfg(test)]
mod tests;
