//! What a picture is drawn with; one drawing code stands before it, a canvas and an SVG behind it.

/// Red, green, blue, 0 to 255.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Colour(pub u8, pub u8, pub u8);

/// How a line is drawn.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stroke {
    /// Its colour.
    pub colour: Colour,
    /// px
    pub width: f64,
    /// Lengths of dash and gap in turn, px; empty for a whole line.
    pub dash: &'static [f64],
}

/// Which part of a text stands at its place.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Anchor {
    /// Its beginning.
    Start,
    /// Its middle.
    Middle,
    /// Its end.
    End,
}

/// How a text is set.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Type {
    /// px
    pub size: f64,
    /// Heavier than the rest?
    pub bold: bool,
    /// Which part stands at its place.
    pub anchor: Anchor,
    /// Its colour.
    pub colour: Colour,
}

/// Something to draw on; places in px from the left and the top.
pub trait Painter {
    /// Fills the area within the points.
    fn fill(&mut self, points: &[(f64, f64)], colour: Colour);
    /// Draws a line through the points.
    fn line(&mut self, points: &[(f64, f64)], stroke: Stroke);
    /// Sets a text with its baseline at a place.
    fn text(&mut self, at: (f64, f64), text: &str, set: Type);
    /// How wide a text is, px.
    fn width_of(&self, text: &str, set: Type) -> f64;
}

/// Fills a rectangle.
pub fn rectangle(on: &mut dyn Painter, left: f64, top: f64, width: f64, height: f64, colour: Colour) {
    on.fill(&[(left, top), (left + width, top), (left + width, top + height), (left, top + height)], colour);
}

/// The beginning of a text that fits a width, with an ellipsis where it is cut.
pub fn fitting(on: &dyn Painter, text: &str, set: Type, width: f64) -> String {
    if on.width_of(text, set) <= width {
        return text.to_owned();
    }
    let letters: Vec<char> = text.chars().collect();
    let cut = |count: usize| letters[..count].iter().collect::<String>().trim_end().to_owned() + "…";
    let most = (1..letters.len()).rev().find(|&count| on.width_of(&cut(count), set) <= width);
    most.map_or_else(String::new, cut)
}
