//! What a picture needs of whatever it is painted on: fill, stroke, write, measure.
//!
//! Coordinates are CSS pixels from the upper left corner, y downwards; angles are radians from the x axis,
//! turning the way the clock does on screen.

use super::colour::Colour;
use std::f64::consts::PI;

/// (x, y), CSS pixels.
pub type Point = (f64, f64);

/// A box with its sides along the axes, CSS pixels.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Rect {
    /// Least x.
    pub left: f64,
    /// Least y.
    pub top: f64,
    /// Greatest x.
    pub right: f64,
    /// Greatest y.
    pub bottom: f64,
}

impl Rect {
    /// From x and y of the upper left corner, width and height.
    pub fn new(left: f64, top: f64, width: f64, height: f64) -> Self {
        Self { left, top, right: left + width, bottom: top + height }
    }

    /// Right minus left.
    pub fn width(&self) -> f64 {
        self.right - self.left
    }

    /// Bottom minus top.
    pub fn height(&self) -> f64 {
        self.bottom - self.top
    }

    /// Do the two share any area?
    pub fn overlaps(&self, other: &Self) -> bool {
        self.left < other.right
            && other.left < self.right
            && self.top < other.bottom
            && other.top < self.bottom
    }

    /// Does it hold this point?
    pub fn holds(&self, (x, y): Point) -> bool {
        x >= self.left && x <= self.right && y >= self.top && y <= self.bottom
    }

    /// The same box, wider by `by` on each side.
    #[must_use]
    pub fn grown(&self, by: f64) -> Self {
        Self { left: self.left - by, top: self.top - by, right: self.right + by, bottom: self.bottom + by }
    }
}

/// One step of a path.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Step {
    /// Begin here.
    Move(Point),
    /// Straight on to here.
    Line(Point),
    /// Along a circle, by less than a full turn; a straight line leads to its first point.
    Arc {
        /// Centre of the circle.
        centre: Point,
        /// Its radius.
        radius: f64,
        /// Angle where the arc begins.
        from: f64,
        /// Angle where it ends; below `from` it turns the other way.
        to: f64,
    },
    /// Back to the beginning.
    Close,
}

/// An outline of straight lines and arcs.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Path {
    /// Its steps in order.
    pub steps: Vec<Step>,
}

impl Path {
    /// Straight lines through points.
    pub fn through(points: &[Point]) -> Self {
        let step = |(i, &point)| if i == 0 { Step::Move(point) } else { Step::Line(point) };
        Self { steps: points.iter().enumerate().map(step).collect() }
    }

    /// A box.
    pub fn rect(r: Rect) -> Self {
        Self::through(&[(r.left, r.top), (r.right, r.top), (r.right, r.bottom), (r.left, r.bottom)]).closed()
    }

    /// A circle, as two halves.
    pub fn circle(centre: Point, radius: f64) -> Self {
        Self::default().arc(centre, radius, 0.0, PI).arc(centre, radius, PI, 2.0 * PI).closed()
    }

    /// Straight on to a point, or the beginning at it.
    #[must_use]
    pub fn line(mut self, to: Point) -> Self {
        self.steps.push(if self.steps.is_empty() { Step::Move(to) } else { Step::Line(to) });
        self
    }

    /// On along an arc.
    #[must_use]
    pub fn arc(mut self, centre: Point, radius: f64, from: f64, to: f64) -> Self {
        if self.steps.is_empty() {
            self.steps.push(Step::Move(on_circle(centre, radius, from)));
        }
        self.steps.push(Step::Arc { centre, radius, from, to });
        self
    }

    /// Back to the beginning.
    #[must_use]
    pub fn closed(mut self) -> Self {
        self.steps.push(Step::Close);
        self
    }
}

/// The point of a circle at an angle.
pub fn on_circle(centre: Point, radius: f64, angle: f64) -> Point {
    (centre.0 + radius * libm::cos(angle), centre.1 + radius * libm::sin(angle))
}

/// What an area is filled with.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Fill<'a> {
    /// One colour, opaque at 1.
    Plain {
        /// The colour.
        colour: Colour,
        /// 0 to 1.
        opacity: f64,
    },
    /// Colours along a straight line, the end colours beyond it.
    Linear {
        /// Where 0 is.
        from: Point,
        /// Where 1 is.
        to: Point,
        /// (place from 0 to 1, ascending; colour); twice the same place is a jump.
        stops: &'a [(f64, Colour)],
    },
    /// Colours outwards from a centre, the end colour beyond the radius.
    Radial {
        /// Where 0 is.
        centre: Point,
        /// How far off 1 is.
        radius: f64,
        /// (place from 0 to 1, ascending; colour); twice the same place is a jump.
        stops: &'a [(f64, Colour)],
    },
}

/// How a line is drawn.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stroke {
    /// Its colour.
    pub colour: Colour,
    /// 0 to 1.
    pub opacity: f64,
    /// Its width.
    pub width: f64,
    /// Lengths drawn and left out in turn; empty: all drawn.
    pub dash: &'static [f64],
}

impl Stroke {
    /// An opaque line without gaps.
    pub fn plain(colour: Colour, width: f64) -> Self {
        Self { colour, opacity: 1.0, width, dash: &[] }
    }
}

/// How heavy letters are.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Weight {
    /// 400
    Regular,
    /// 600
    Bold,
}

/// Which point of the text stands at its place.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Anchor {
    /// Its left end.
    Start,
    /// Its middle.
    Middle,
    /// Its right end.
    End,
}

/// How text is written.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TextStyle {
    /// Font size.
    pub size: f64,
    /// How heavy.
    pub weight: Weight,
    /// Its colour.
    pub colour: Colour,
    /// Which point of it stands at its place.
    pub anchor: Anchor,
    /// A rim of this colour around the letters, so that lines behind do not disturb.
    pub rim: Option<Colour>,
}

/// Width of the rim around letters.
pub const RIM: f64 = 4.0;

/// Height of digits and capitals above the base line, as part of the font size (0.72 to 0.73 in the usual
/// sans-serif fonts, rounded up).
pub const ASCENT: f64 = 0.75;

/// Depth of the letters below the base line, as part of the font size (0.21 to 0.24 in the usual fonts).
pub const DESCENT: f64 = 0.24;

/// Something to paint on.
pub trait Painter {
    /// Fills an outline.
    fn fill(&mut self, path: &Path, fill: &Fill);

    /// Draws along an outline.
    fn stroke(&mut self, path: &Path, stroke: &Stroke);

    /// Writes one line, its base line at y.
    fn text(&mut self, text: &str, at: Point, style: &TextStyle);

    /// Width of a line of text, CSS pixels.
    fn text_width(&self, text: &str, size: f64, weight: Weight) -> f64;

    /// Device pixels per CSS pixel; straight lines are put onto whole device pixels.
    fn pixel_ratio(&self) -> f64 {
        1.0
    }
}
