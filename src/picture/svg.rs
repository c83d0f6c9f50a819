//! A painter that writes SVG: for the sheet and for batches. The same input gives the same text.

use super::painter::{Anchor, Colour, Painter, Stroke, Type};
use std::fmt::Write;

/// Draws into SVG text.
#[derive(Clone, Debug)]
pub struct Svg {
    body: String,
}

impl Svg {
    /// An empty picture of a size in px, with a title for those who cannot see it.
    pub fn new(width: f64, height: f64, title: &str, paper: Colour) -> Self {
        let mut body = String::new();
        // Writing into a string cannot fail.
        let _ = writeln!(
            body,
            "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"{width}\" height=\"{height}\" viewBox=\"0 0 {width} {height}\" \
             role=\"img\" font-family=\"ui-sans-serif, system-ui, sans-serif\">\n<title>{}</title>\n\
             <rect width=\"100%\" height=\"100%\" fill=\"{}\"/>",
            escaped(title),
            hex(paper)
        );
        Self { body }
    }

    /// The finished text.
    pub fn finish(mut self) -> String {
        self.body.push_str("</svg>\n");
        self.body
    }

    fn path(points: &[(f64, f64)]) -> String {
        let mut path = String::new();
        for (i, (x, y)) in points.iter().enumerate() {
            let _ = write!(path, "{}{} {}", if i == 0 { 'M' } else { 'L' }, short(*x), short(*y));
        }
        path
    }
}

impl Painter for Svg {
    fn fill(&mut self, points: &[(f64, f64)], colour: Colour) {
        let _ = writeln!(self.body, "<path d=\"{}Z\" fill=\"{}\"/>", Self::path(points), hex(colour));
    }

    fn line(&mut self, points: &[(f64, f64)], stroke: Stroke) {
        let dash = if stroke.dash.is_empty() {
            String::new()
        } else {
            let lengths: Vec<String> = stroke.dash.iter().map(|&length| short(length)).collect();
            format!(" stroke-dasharray=\"{}\"", lengths.join(" "))
        };
        let _ = writeln!(
            self.body,
            "<path d=\"{}\" fill=\"none\" stroke=\"{}\" stroke-width=\"{}\"{dash} stroke-linejoin=\"round\"/>",
            Self::path(points),
            hex(stroke.colour),
            short(stroke.width)
        );
    }

    fn text(&mut self, at: (f64, f64), text: &str, set: Type) {
        let anchor = match set.anchor {
            Anchor::Start => "start",
            Anchor::Middle => "middle",
            Anchor::End => "end",
        };
        let weight = if set.bold { " font-weight=\"600\"" } else { "" };
        let _ = writeln!(
            self.body,
            "<text x=\"{}\" y=\"{}\" font-size=\"{}\" text-anchor=\"{anchor}\" fill=\"{}\"{weight}>{}</text>",
            short(at.0),
            short(at.1),
            short(set.size),
            hex(set.colour),
            escaped(text)
        );
    }

    /// An estimate on the wide side: the font of the reader is not known.
    fn width_of(&self, text: &str, set: Type) -> f64 {
        let ems: f64 = text.chars().map(advance).sum();
        ems * set.size * if set.bold { 1.08 } else { 1.0 }
    }
}

/// How far a letter reaches, in ems; sizes of common sans-serif fonts, from memory, rounded up.
fn advance(letter: char) -> f64 {
    match letter {
        'i' | 'j' | 'l' | '.' | ',' | ':' | ';' | '\'' | '|' | ' ' => 0.32,
        'f' | 't' | 'r' | '(' | ')' | '-' | '/' => 0.42,
        'm' | 'w' | 'M' | 'W' | '…' | '→' => 0.98,
        'A'..='Z' => 0.74,
        _ => 0.62,
    }
}

fn hex(colour: Colour) -> String {
    format!("#{:02x}{:02x}{:02x}", colour.0, colour.1, colour.2)
}

fn short(x: f64) -> String {
    let tenths = (x * 10.0).round() / 10.0;
    // No minus before nothing.
    format!("{}", if tenths == 0.0 { 0.0 } else { tenths })
}

fn escaped(text: &str) -> String {
    text.replace('&', "&amp;").replace('<', "&lt;").replace('>', "&gt;").replace('"', "&quot;")
}
