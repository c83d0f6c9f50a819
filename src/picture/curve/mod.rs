//! Temperatures over the clock, with limits, events and the time of the slider.

mod flags;
mod names;

use super::Picture;
use super::free::Taken;
use super::number::{fixed, span, tenths};
use super::painter::{Anchor, Fill, Painter, Path, Point, Rect, Stroke, Weight};
use super::palette::Inks;
use super::pen::{Hand, NARROW, Pen};
use super::plot::{AXIS_GAP, Plot, axis_width, draw_markers, height_at, line_stroke, temperature_ticks};
use super::svg::SvgPainter;
use super::table::Table;
use super::time_axis::{Room, TimeAxis, time_axis};
use crate::units::clock::Clock;
use flags::Flag;
use names::Names;

/// Temperatures over time.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Curve<'a> {
    /// s after the stop, ascending.
    pub times: &'a [f64],
    /// What is shown over them; told apart by dash, marker and name.
    pub lines: &'a [CurveLine<'a>],
    /// Temperatures not to be passed, or to be reached.
    pub limits: &'a [Limit<'a>],
    /// What happens when.
    pub events: &'a [Event<'a>],
    /// The time of the slider.
    pub cursor: Option<Cursor<'a>>,
    /// Date and time of time zero, where there is one.
    pub stop: Option<Clock>,
    /// Unit of the temperatures, "°C".
    pub unit: &'a str,
}

/// One line of a curve.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CurveLine<'a> {
    /// "hottest of the contents"
    pub name: &'a str,
    /// One temperature per time.
    pub values: &'a [f64],
    /// One lowest and one highest temperature per time, where a range is known.
    pub band: Option<(&'a [f64], &'a [f64])>,
}

/// A temperature that matters.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Limit<'a> {
    /// Where it is.
    pub value: f64,
    /// "contents below 60 °C"
    pub words: &'a str,
}

/// What kind of answer an event is.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum EventKind {
    /// It is ready; a filled circle.
    Ready,
    /// It may stand until then; a filled square.
    Standing,
}

/// A moment that matters.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Event<'a> {
    /// s after the stop.
    pub time: f64,
    /// Temperature where its mark stands, where it belongs to one.
    pub value: Option<f64>,
    /// "ready Tue 14:20"
    pub words: &'a str,
    /// What it answers.
    pub kind: EventKind,
}

/// The time of the slider.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Cursor<'a> {
    /// s after the stop.
    pub time: f64,
    /// "Mon 09:10"
    pub words: &'a str,
}

/// Space above and below what is drawn, as part of its range.
const PAD: f64 = 0.06;
/// No temperature axis shows less than this, in degrees.
const LEAST_SPAN: f64 = 2.0;
/// Half the size of an event's mark with its rim, px.
const EVENT_MARK: f64 = 6.5;
/// Distance from one row of text to the next, as part of the font size.
const PITCH: f64 = 1.45;

/// Gap between the plot and what stands above it, px.
const ABOVE: f64 = 8.0;

/// Where things go.
struct Layout {
    plot: Plot,
    axis: TimeAxis,
    names: Names,
    flags: Vec<Flag>,
    /// Distance from one row of text to the next, px.
    pitch: f64,
}

impl Layout {
    fn new(curve: &Curve, pen: &Pen, width: f64, height: f64) -> Self {
        let pitch = (PITCH * pen.size).round();
        // The time axis takes one row or two.
        let bottom = height - 8.0 - 2.0 * pitch;
        let all: Vec<&str> = curve.lines.iter().map(|line| line.name).collect();
        let names = Names::new(pen, &all, width, bottom - 3.0 * pitch, width < NARROW);
        // The plot can only be lower than this, and its ticks no denser.
        let left = axis_width(pen, curve.y_range(), bottom, curve.unit);
        let area = Rect { left, right: width - names.right(pen), top: 0.0, bottom };
        let mut plot = Plot { area, x: curve.x_range(), y: curve.y_range() };
        let width_of = |text: &str| pen.width(text, Weight::Regular);
        let room = Room { from: plot.x.0, to: plot.x.1, px: area.width(), width_of: &width_of };
        let axis = time_axis(&room, curve.stop);
        plot.area.bottom = height - 8.0 - pitch * if axis.has_two_rows() { 2.0 } else { 1.0 };
        let flags = flags::place(pen, &curve.poles(&plot), left, width - 1.0);
        let rows = names.rows() + flags::rows(&flags).max(1);
        plot.area.top = rows as f64 * pitch + ABOVE;
        Self { plot, axis, names, flags, pitch }
    }
}

impl Curve<'_> {
    fn x_range(&self) -> (f64, f64) {
        span(self.times.iter().copied(), 0.0, 1.0)
    }

    fn y_range(&self) -> (f64, f64) {
        let lines = self.lines.iter().flat_map(|line| line.values.iter().copied());
        let bands = self.lines.iter().filter_map(|line| line.band);
        let edges = bands.flat_map(|(low, high)| low.iter().chain(high).copied());
        let limits = self.limits.iter().map(|limit| limit.value);
        span(lines.chain(edges).chain(limits), PAD, LEAST_SPAN)
    }

    /// The value of a line at a time.
    fn at(&self, line: &CurveLine, time: f64) -> Option<f64> {
        let points: Vec<Point> = self
            .times
            .iter()
            .zip(line.values)
            .filter(|(t, value)| t.is_finite() && value.is_finite())
            .map(|(t, value)| (*t, *value))
            .collect();
        height_at(&points, time)
    }

    fn time_words(&self, time: f64, axis: &TimeAxis) -> String {
        match self.stop.and_then(|stop| stop.after(time)) {
            Some(clock) if axis.title.is_empty() => format!("{} {}", clock.short(), clock.day()),
            _ => crate::units::words::duration(time),
        }
    }

    fn draw_limits(&self, pen: &mut Pen, plot: &Plot) {
        let stroke = Stroke { dash: &[6.0, 4.0], ..Stroke::plain(pen.inks.ink, 1.0) };
        for limit in self.limits.iter().filter(|limit| limit.value.is_finite()) {
            pen.across(plot.y(limit.value), plot.area.left, plot.area.right, &stroke);
        }
    }

    fn draw_lines(&self, pen: &mut Pen, plot: &Plot) -> Vec<Vec<Point>> {
        for (number, line) in self.lines.iter().enumerate() {
            if let Some((low, high)) = line.band {
                let mut outline = plot.points(self.times, low);
                outline.extend(plot.points(self.times, high).into_iter().rev());
                let fill = Fill::Plain { colour: pen.inks.line(number), opacity: 0.16 };
                pen.painter.fill(&Path::through(&outline).closed(), &fill);
            }
        }
        let lines: Vec<Vec<Point>> =
            self.lines.iter().map(|line| plot.points(self.times, line.values)).collect();
        for (number, line) in lines.iter().enumerate().rev() {
            let stroke = line_stroke(pen, number);
            pen.painter.stroke(&Path::through(line), &stroke);
        }
        if lines.len() > 1 {
            for (number, line) in lines.iter().enumerate().rev() {
                draw_markers(pen, line, number, lines.len());
            }
        }
        lines
    }

    /// A label on each limit, where it covers no line and touches no other label.
    fn draw_limit_words(&self, pen: &mut Pen, plot: &Plot, lines: &[Vec<Point>], flags: &[Flag]) {
        let mut taken = Taken::default();
        for line in lines {
            taken.spare(line);
        }
        for flag in flags {
            taken.spare(&[(flag.x, plot.area.top), (flag.x, plot.area.bottom)]);
            if let Some(value) = self.events[flag.event].value.filter(|value| value.is_finite()) {
                let y = plot.y(value);
                taken.keep_off(Rect { left: flag.x, right: flag.x, top: y, bottom: y }.grown(EVENT_MARK));
            }
        }
        for limit in self.limits.iter().filter(|limit| limit.value.is_finite()) {
            taken.spare(&[(plot.area.left, plot.y(limit.value)), (plot.area.right, plot.y(limit.value))]);
        }
        for limit in self.limits.iter().filter(|limit| limit.value.is_finite()) {
            let room = plot.area.width() - 12.0;
            let words = pen.shortened(limit.words, room, Weight::Regular);
            let hand = Hand { colour: pen.inks.ink, rim: true, ..pen.quiet(Anchor::Start) };
            let wide = pen.width(&words, Weight::Regular);
            let off = 0.62 * pen.size + 2.0;
            let y = plot.y(limit.value);
            let places = |off: f64| {
                let across = (0..=8).map(|i| plot.area.left + 6.0 + f64::from(i) / 8.0 * (room - wide));
                let at = across.flat_map(|x| [(x, y - off), (x, y + off)]);
                at.map(|at| (at, pen.text_box(&words, at, &hand))).collect::<Vec<(Point, Rect)>>()
            };
            let (near, far) = (places(off), places(off + pen.size + 4.0));
            let found =
                taken.best(near.into_iter(), &plot.area).or_else(|| taken.best(far.into_iter(), &plot.area));
            if let Some(at) = found.filter(|_| !words.is_empty()) {
                pen.write(&words, at, &hand);
            }
        }
    }

    fn draw_flags(&self, pen: &mut Pen, plot: &Plot, flags: &[Flag], pitch: f64) {
        let hand = pen.strong(Anchor::Start);
        for flag in flags {
            let event = &self.events[flag.event];
            let y = plot.area.top - ABOVE - (flag.row as f64 + 0.5) * pitch;
            let pole = Stroke { opacity: 0.6, ..Stroke::plain(pen.inks.ink, 1.0) };
            pen.upright(flag.x, y - 0.5 * pen.size, plot.area.bottom, &pole);
            pen.write(event.words, (flag.words_at(), y), &Hand { anchor: flag.anchor, ..hand });
            if let Some(value) = event.value.filter(|value| value.is_finite()) {
                draw_event_mark(pen, (flag.x, plot.y(value)), event.kind);
            }
        }
    }

    fn draw_cursor(&self, pen: &mut Pen, plot: &Plot, lines: &[Vec<Point>]) {
        let Some(cursor) = self.cursor else { return };
        let x = plot.x(cursor.time.clamp(plot.x.0, plot.x.1));
        pen.upright(x, plot.area.top, plot.area.bottom, &Stroke::plain(pen.inks.cursor, 1.5));
        for (number, line) in lines.iter().enumerate() {
            if let Some(y) = height_at(line, x) {
                pen.fill(&Path::circle((x, y), 5.0), pen.inks.paper);
                pen.fill(&Path::circle((x, y), 3.5), pen.inks.line(number));
            }
        }
    }

    /// The time axis and the cursor's time on it, which hides the ticks' labels that it touches.
    fn draw_times(&self, pen: &mut Pen, plot: &Plot, axis: &TimeAxis, pitch: f64, width: f64) {
        let first = plot.area.bottom + 6.0 + 0.5 * pitch;
        let second = first + pitch;
        let pill = self.cursor_pill(pen, plot, first, width);
        let hand = pen.quiet(Anchor::Middle);
        let free = |pen: &Pen, label: &str, at: Point| {
            let place = pen.text_box(label, at, &hand);
            let inside = place.left >= 0.0 && place.right <= width;
            inside && !pill.as_ref().is_some_and(|(pill, _)| pill.grown(3.0).overlaps(&place))
        };
        let mark = Stroke { opacity: 0.55, ..Stroke::plain(pen.inks.quiet, 1.0) };
        for (t, label) in &axis.ticks {
            let x = plot.x(*t);
            pen.upright(x, plot.area.bottom, plot.area.bottom + 5.0, &mark);
            if !label.is_empty() && free(pen, label, (x, first)) {
                pen.write(label, (x, first), &hand);
            }
        }
        let day_row = if axis.days_alone { first } else { second };
        for (from, to, name) in axis.days.iter().filter(|day| !day.2.is_empty()) {
            let x = 0.5 * (plot.x(*from) + plot.x(*to));
            if free(pen, name, (x, day_row)) {
                pen.write(name, (x, day_row), &hand);
            }
        }
        for (from, _, _) in axis.days.iter().skip(1) {
            let top = if axis.days_alone { plot.area.bottom } else { second - 0.4 * pitch };
            let x = plot.x(*from);
            if !(axis.days_alone && pill.as_ref().is_some_and(|(pill, _)| pill.holds((x, first)))) {
                pen.upright(x, top, day_row + 0.4 * pitch, &mark);
            }
        }
        if !axis.title.is_empty() {
            let middle = 0.5 * (plot.area.left + plot.area.right);
            let title = pen.shortened(&axis.title, plot.area.width(), Weight::Regular);
            pen.write(&title, (middle, second), &hand);
        }
        if let (Some((pill, words)), Some(_)) = (pill, self.cursor) {
            pen.fill(&Path::rect(pill), pen.inks.cursor);
            let hand = Hand { colour: pen.inks.paper, ..pen.strong(Anchor::Middle) };
            pen.write(&words, (0.5 * (pill.left + pill.right), first), &hand);
        }
    }

    /// Box and words of the cursor's time.
    fn cursor_pill(&self, pen: &Pen, plot: &Plot, y: f64, width: f64) -> Option<(Rect, String)> {
        let cursor = self.cursor?;
        let words = pen.shortened(cursor.words, width - 16.0, Weight::Bold);
        let half = 0.5 * pen.width(&words, Weight::Bold) + 6.0;
        let x = plot.x(cursor.time.clamp(plot.x.0, plot.x.1)).clamp(half, (width - half).max(half));
        let tall = 0.5 * pen.size + 3.0;
        Some((Rect { left: x - half, right: x + half, top: y - tall, bottom: y + tall }, words))
    }

    /// The events that lie on the axis: (number, px, words).
    fn poles(&self, plot: &Plot) -> Vec<(usize, f64, &str)> {
        let on_axis = |(_, event): &(usize, &Event)| event.time >= plot.x.0 && event.time <= plot.x.1;
        let pole = |(number, event): (usize, &Event)| (number, plot.x(event.time));
        let events = self.events.iter().enumerate().filter(on_axis);
        events.map(pole).map(|(number, x)| (number, x, self.events[number].words)).collect()
    }

    /// The ticks over a usual width: the rows of the table.
    fn usual_axis(&self) -> TimeAxis {
        let (from, to) = self.x_range();
        time_axis(
            &Room { from, to, px: 720.0, width_of: &|text| 8.0 * text.chars().count() as f64 },
            self.stop,
        )
    }
}

/// A mark on a line: what kind of answer, by its form.
fn draw_event_mark(pen: &mut Pen, (x, y): Point, kind: EventKind) {
    let outline = |half: f64| match kind {
        EventKind::Ready => Path::circle((x, y), half),
        EventKind::Standing => Path::rect(Rect::new(x - half, y - half, 2.0 * half, 2.0 * half)),
    };
    pen.fill(&outline(EVENT_MARK), pen.inks.paper);
    pen.fill(&outline(EVENT_MARK - 1.5), pen.inks.ink);
}

impl Picture for Curve<'_> {
    fn title(&self) -> String {
        "Over the clock".to_owned()
    }

    fn description(&self) -> String {
        let (from, to) = self.x_range();
        let axis = self.usual_axis();
        let ends = |line: &CurveLine| {
            let value = |t: f64| self.at(line, t).map_or_else(|| "unknown".to_owned(), tenths);
            format!("{} from {} to {} {}", line.name, value(from), value(to), self.unit)
        };
        let lines: Vec<String> = self.lines.iter().map(ends).collect();
        let events: Vec<&str> = self.events.iter().map(|event| event.words).collect();
        let events =
            if events.is_empty() { String::new() } else { format!(" Marked: {}.", events.join("; ")) };
        let until = self.time_words(to, &axis);
        format!("Temperatures from the stop until {until}: {}.{events}", lines.join("; "))
    }

    fn height(&self, width: f64) -> f64 {
        let mut measure = SvgPainter::new("", width, 0.0);
        let pen = Pen::new(&mut measure, super::palette::Theme::Light.inks(), width);
        let plot = (0.42 * width).clamp(190.0, 300.0).round();
        let layout = Layout::new(self, &pen, width, 2.0 * plot);
        layout.plot.area.top + plot + (2.0 * plot - layout.plot.area.bottom)
    }

    fn draw(&self, painter: &mut dyn Painter, inks: &Inks, width: f64, height: f64) {
        let mut pen = Pen::new(painter, inks, width);
        let Layout { plot, axis, names, flags, pitch } = Layout::new(self, &pen, width, height);
        plot.draw_axis(&mut pen, &temperature_ticks(plot.y, plot.area.height()));
        let hand = pen.quiet(Anchor::End);
        pen.write(self.unit, (plot.area.left - AXIS_GAP, plot.area.top - ABOVE - 0.5 * pitch), &hand);
        self.draw_limits(&mut pen, &plot);
        let lines = self.draw_lines(&mut pen, &plot);
        self.draw_cursor(&mut pen, &plot, &lines);
        self.draw_flags(&mut pen, &plot, &flags, pitch);
        self.draw_limit_words(&mut pen, &plot, &lines, &flags);
        self.draw_times(&mut pen, &plot, &axis, pitch, width);
        names.draw(&mut pen, &plot, &lines, pitch);
    }

    fn table(&self) -> Table {
        let axis = self.usual_axis();
        let (from, to) = self.x_range();
        let mut times: Vec<f64> = axis.ticks.iter().map(|(t, _)| *t).collect();
        times.extend([from, to]);
        times.extend(self.events.iter().map(|event| event.time).filter(|t| *t >= from && *t <= to));
        times.sort_by(f64::total_cmp);
        times.dedup_by(|a, b| (*a - *b).abs() < 1e-6 * (to - from));
        let row = |t: f64| {
            let value = |line: &CurveLine| self.at(line, t).map_or_else(|| fixed(f64::NAN, 1), tenths);
            std::iter::once(self.time_words(t, &axis)).chain(self.lines.iter().map(value)).collect()
        };
        let heading = |line: &CurveLine| format!("{}, {}", line.name, self.unit);
        Table {
            caption: "Temperatures over the clock".to_owned(),
            columns: std::iter::once("Time".to_owned()).chain(self.lines.iter().map(heading)).collect(),
            rows: times.into_iter().map(row).collect(),
        }
    }
}

#[cfg(test)]
mod tests;
