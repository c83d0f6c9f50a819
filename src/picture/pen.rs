//! A painter with a theme: the few strokes that every picture is made of.

use super::colour::Colour;
use super::painter::{ASCENT, Anchor, DESCENT, Fill, Painter, Path, Point, Rect, Stroke, TextStyle, Weight};
use super::palette::Inks;

/// Font size of a picture of this width.
pub fn font_size(width: f64) -> f64 {
    if width < NARROW { 12.0 } else { 13.0 }
}

/// Below this width pictures take the form for narrow pages.
pub const NARROW: f64 = 460.0;

/// Font size, weight, colour and anchor of a text; its rim is the paper.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Hand {
    /// Font size.
    pub size: f64,
    /// How heavy.
    pub weight: Weight,
    /// Its colour.
    pub colour: Colour,
    /// Which point of it stands at its place.
    pub anchor: Anchor,
    /// Has it a rim of the paper's colour?
    pub rim: bool,
}

/// A painter and the colours it uses.
pub struct Pen<'a> {
    /// What is painted on.
    pub painter: &'a mut dyn Painter,
    /// The colours.
    pub inks: &'a Inks,
    /// Font size of the picture.
    pub size: f64,
}

impl<'a> Pen<'a> {
    /// For a picture of this width.
    pub fn new(painter: &'a mut dyn Painter, inks: &'a Inks, width: f64) -> Self {
        Self { painter, inks, size: font_size(width) }
    }

    /// Main text: ink, bold.
    pub fn strong(&self, anchor: Anchor) -> Hand {
        Hand { size: self.size, weight: Weight::Bold, colour: self.inks.ink, anchor, rim: false }
    }

    /// Second text: quiet, regular.
    pub fn quiet(&self, anchor: Anchor) -> Hand {
        Hand { size: self.size, weight: Weight::Regular, colour: self.inks.quiet, anchor, rim: false }
    }

    /// Width of a text.
    pub fn width(&self, text: &str, weight: Weight) -> f64 {
        self.painter.text_width(text, self.size, weight)
    }

    /// The box a text takes up when its middle line is at `y`.
    pub fn text_box(&self, text: &str, (x, y): Point, hand: &Hand) -> Rect {
        let width = self.painter.text_width(text, hand.size, hand.weight);
        let left = match hand.anchor {
            Anchor::Start => x,
            Anchor::Middle => x - 0.5 * width,
            Anchor::End => x - width,
        };
        let base = base_line(y, hand.size);
        Rect { left, right: left + width, top: base - ASCENT * hand.size, bottom: base + DESCENT * hand.size }
    }

    /// Writes a text with its middle line (that of its digits and capitals) at `y`.
    pub fn write(&mut self, text: &str, (x, y): Point, hand: &Hand) {
        let style = TextStyle {
            size: hand.size,
            weight: hand.weight,
            colour: hand.colour,
            anchor: hand.anchor,
            rim: hand.rim.then_some(self.inks.paper),
        };
        self.painter.text(text, (x, base_line(y, hand.size)), &style);
    }

    /// The text, or as much of its beginning as fits into `most`, with "…" for the rest.
    pub fn shortened(&self, text: &str, most: f64, weight: Weight) -> String {
        if self.width(text, weight) <= most {
            return text.to_owned();
        }
        let letters: Vec<char> = text.chars().collect();
        for kept in (1..letters.len()).rev() {
            let begin: String = letters[..kept].iter().collect();
            let short = format!("{}…", begin.trim_end_matches([' ', ',', '.', '-']));
            if self.width(&short, weight) <= most {
                return short;
            }
        }
        String::new()
    }

    /// The text on at most two lines no wider than `most`, broken between words; shortened where that is not enough.
    pub fn wrapped(&self, text: &str, most: f64, weight: Weight) -> Vec<String> {
        if self.width(text, weight) <= most {
            return vec![text.to_owned()];
        }
        let breaks: Vec<usize> = text.match_indices(' ').map(|(at, _)| at).collect();
        let first = breaks.iter().rev().find(|&&at| self.width(&text[..at], weight) <= most);
        match first {
            None => vec![self.shortened(text, most, weight)],
            Some(&at) => vec![text[..at].to_owned(), self.shortened(&text[at + 1..], most, weight)],
        }
    }

    /// Fills with one colour.
    pub fn fill(&mut self, path: &Path, colour: Colour) {
        self.painter.fill(path, &Fill::Plain { colour, opacity: 1.0 });
    }

    /// A line from left to right, put onto whole device pixels.
    pub fn across(&mut self, y: f64, from: f64, to: f64, stroke: &Stroke) {
        let y = self.snapped(y, stroke.width);
        self.painter.stroke(&Path::through(&[(from, y), (to, y)]), stroke);
    }

    /// A line from top to bottom, put onto whole device pixels.
    pub fn upright(&mut self, x: f64, from: f64, to: f64, stroke: &Stroke) {
        let x = self.snapped(x, stroke.width);
        self.painter.stroke(&Path::through(&[(x, from), (x, to)]), stroke);
    }

    /// Where the middle of a line of this width has to be for its edges to fall between device pixels.
    pub fn snapped(&self, at: f64, width: f64) -> f64 {
        let ratio = self.painter.pixel_ratio();
        let half = 0.5 * (width * ratio).round().max(1.0);
        ((at * ratio - half).round() + half) / ratio
    }
}

/// Base line of a text whose digits and capitals have their middle at `y`.
fn base_line(y: f64, size: f64) -> f64 {
    // Half of the height of digits, 0.73 of the font size in most sans-serif fonts.
    y + 0.365 * size
}

#[cfg(test)]
mod tests {
    use super::super::palette::Theme;
    use super::super::svg::SvgPainter;
    use super::*;

    #[test]
    fn a_text_too_wide_keeps_its_beginning() {
        let mut svg = SvgPainter::new("t", 100.0, 100.0);
        let pen = Pen::new(&mut svg, Theme::Light.inks(), 300.0);
        assert_eq!(pen.shortened("wool", 100.0, Weight::Regular), "wool");
        let short = pen.shortened("mineral wool, thick", 80.0, Weight::Regular);
        assert!(short.starts_with("miner") && short.ends_with('…'), "{short}");
        assert!(pen.width(&short, Weight::Regular) <= 80.0);
        assert_eq!(pen.shortened("wool", 5.0, Weight::Regular), "");
        assert_eq!(
            pen.wrapped("hottest of the contents", 90.0, Weight::Regular),
            ["hottest of the", "contents"]
        );
    }

    #[test]
    fn lines_fall_onto_whole_pixels() {
        let mut svg = SvgPainter::new("t", 100.0, 100.0);
        let pen = Pen::new(&mut svg, Theme::Light.inks(), 300.0);
        assert_eq!(
            [pen.snapped(10.2, 1.0), pen.snapped(10.9, 1.0), pen.snapped(10.9, 2.0)],
            [10.5, 10.5, 11.0]
        );
    }
}
