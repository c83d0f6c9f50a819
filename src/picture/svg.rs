//! Painting as SVG: a standalone file, the same bytes for the same picture.

use super::colour::Colour;
use super::painter::{Anchor, Fill, Painter, Path, Point, RIM, Step, Stroke, TextStyle, Weight, on_circle};
use super::widths;
use std::fmt::Write;

/// Collects what is painted as SVG elements.
///
/// ```
/// use stillheat::picture::{Anchor, Colour, Painter, SvgPainter, TextStyle, Weight};
/// let mut svg = SvgPainter::new("hello", 120.0, 30.0);
/// let style = TextStyle {
///     size: 13.0,
///     weight: Weight::Regular,
///     colour: Colour::BLACK,
///     anchor: Anchor::Start,
///     rim: None,
/// };
/// svg.text("60 °C", (10.0, 20.0), &style);
/// let file = svg.finish("A temperature", "Sixty degrees Celsius.");
/// assert!(file.starts_with("<svg ") && file.contains(">60 °C</text>"));
/// ```
#[derive(Clone, Debug)]
pub struct SvgPainter {
    id: String,
    width: f64,
    height: f64,
    /// Gradients.
    definitions: String,
    defined: usize,
    body: String,
}

impl SvgPainter {
    /// An empty picture. `id` begins every id in it, so that several can stand in one document.
    pub fn new(id: &str, width: f64, height: f64) -> Self {
        let id = id.chars().filter(|c| c.is_ascii_alphanumeric() || *c == '-').collect();
        Self { id, width, height, definitions: String::new(), defined: 0, body: String::new() }
    }

    /// The file, with what a reader without sight is told.
    pub fn finish(self, title: &str, description: &str) -> String {
        let Self { id, width, height, definitions, body, .. } = self;
        let (w, h) = (Px(width), Px(height));
        let definitions =
            if definitions.is_empty() { String::new() } else { format!("<defs>\n{definitions}</defs>\n") };
        format!(
            "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"{w}\" height=\"{h}\" viewBox=\"0 0 {w} {h}\" \
             role=\"img\" aria-labelledby=\"{id}-title {id}-desc\" font-family=\"system-ui, sans-serif\">\n\
             <title id=\"{id}-title\">{}</title>\n<desc id=\"{id}-desc\">{}</desc>\n{definitions}{body}</svg>\n",
            escaped(title),
            escaped(description)
        )
    }

    /// Writes into the body; writing to a string cannot fail.
    fn put(&mut self, what: std::fmt::Arguments) {
        let _ = self.body.write_fmt(what);
        self.body.push('\n');
    }

    /// Defines a gradient; its id.
    fn gradient(&mut self, element: &str, place: &str, stops: &[(f64, Colour)]) -> String {
        self.defined += 1;
        let id = format!("{}-{}", self.id, self.defined);
        let d = &mut self.definitions;
        let _ = writeln!(d, "<{element} id=\"{id}\" gradientUnits=\"userSpaceOnUse\" {place}>");
        for (at, colour) in stops {
            let _ = writeln!(d, "<stop offset=\"{}\" stop-color=\"{}\"/>", Part(*at), colour.css());
        }
        let _ = writeln!(d, "</{element}>");
        id
    }
}

impl Painter for SvgPainter {
    fn fill(&mut self, path: &Path, fill: &Fill) {
        let d = written(path);
        match *fill {
            Fill::Plain { colour, opacity } => {
                let opacity = attribute("fill-opacity", opacity);
                self.put(format_args!("<path d=\"{d}\" fill=\"{}\"{opacity}/>", colour.css()));
            }
            Fill::Linear { from, to, stops } => {
                let place = format!(
                    "x1=\"{}\" y1=\"{}\" x2=\"{}\" y2=\"{}\"",
                    Px(from.0),
                    Px(from.1),
                    Px(to.0),
                    Px(to.1)
                );
                let id = self.gradient("linearGradient", &place, stops);
                self.put(format_args!("<path d=\"{d}\" fill=\"url(#{id})\"/>"));
            }
            Fill::Radial { centre, radius, stops } => {
                let place = format!("cx=\"{}\" cy=\"{}\" r=\"{}\"", Px(centre.0), Px(centre.1), Px(radius));
                let id = self.gradient("radialGradient", &place, stops);
                self.put(format_args!("<path d=\"{d}\" fill=\"url(#{id})\"/>"));
            }
        }
    }

    fn stroke(&mut self, path: &Path, stroke: &Stroke) {
        let mut dash = String::new();
        if !stroke.dash.is_empty() {
            let lengths: Vec<String> = stroke.dash.iter().map(|length| Px(*length).to_string()).collect();
            dash = format!(" stroke-dasharray=\"{}\"", lengths.join(" "));
        }
        let opacity = attribute("stroke-opacity", stroke.opacity);
        self.put(format_args!(
            "<path d=\"{}\" fill=\"none\" stroke=\"{}\"{opacity} stroke-width=\"{}\" stroke-linejoin=\"round\"{dash}/>",
            written(path),
            stroke.colour.css(),
            Px(stroke.width)
        ));
    }

    fn text(&mut self, text: &str, at: Point, style: &TextStyle) {
        let anchor = match style.anchor {
            Anchor::Start => "",
            Anchor::Middle => " text-anchor=\"middle\"",
            Anchor::End => " text-anchor=\"end\"",
        };
        let weight = match style.weight {
            Weight::Regular => "",
            Weight::Bold => " font-weight=\"600\"",
        };
        let rim = style.rim.map_or_else(String::new, |colour| {
            let colour = colour.css();
            format!(
                " stroke=\"{colour}\" stroke-width=\"{}\" stroke-linejoin=\"round\" paint-order=\"stroke\"",
                Px(RIM)
            )
        });
        self.put(format_args!(
            "<text x=\"{}\" y=\"{}\" font-size=\"{}\" fill=\"{}\"{weight}{anchor}{rim}>{}</text>",
            Px(at.0),
            Px(at.1),
            Px(style.size),
            style.colour.css(),
            escaped(text)
        ));
    }

    fn text_width(&self, text: &str, size: f64, weight: Weight) -> f64 {
        widths::text_width(text, size, weight)
    }
}

/// An attribute, left out where it is 1.
fn attribute(name: &str, value: f64) -> String {
    if value < 1.0 { format!(" {name}=\"{}\"", Px(value)) } else { String::new() }
}

/// The outline in the letters of a `d` attribute.
fn written(path: &Path) -> String {
    let mut d = String::new();
    for step in &path.steps {
        let _ = match *step {
            Step::Move((x, y)) => write!(d, "M{} {}", Px(x), Px(y)),
            Step::Line((x, y)) => write!(d, "L{} {}", Px(x), Px(y)),
            Step::Arc { centre, radius, from, to } => {
                let (begin, end) = (on_circle(centre, radius, from), on_circle(centre, radius, to));
                let large = u8::from((to - from).abs() > std::f64::consts::PI);
                let clockwise = u8::from(to > from);
                let r = Px(radius);
                write!(d, "L{} {}A{r} {r} 0 {large} {clockwise} ", Px(begin.0), Px(begin.1))
                    .and_then(|()| write!(d, "{} {}", Px(end.0), Px(end.1)))
            }
            Step::Close => write!(d, "Z"),
        };
    }
    d
}

/// A number of pixels, to a hundredth, without needless zeros.
struct Px(f64);

impl std::fmt::Display for Px {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        // A number that is none would spoil the file: nothing finite is drawn there.
        let rounded = if self.0.is_finite() { (self.0 * 100.0).round() / 100.0 } else { 0.0 };
        write!(f, "{}", rounded + 0.0)
    }
}

/// A part of 1, to a ten-millionth: a radius may be many thousands of pixels.
struct Part(f64);

impl std::fmt::Display for Part {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        let part = if self.0.is_finite() { self.0.clamp(0.0, 1.0) } else { 0.0 };
        write!(f, "{}", (part * 1e7).round() / 1e7)
    }
}

/// Text as XML takes it; what XML 1.0 does not allow is left out.
fn escaped(text: &str) -> String {
    let mut out = String::with_capacity(text.len());
    for letter in text.chars() {
        match letter {
            '&' => out.push_str("&amp;"),
            '<' => out.push_str("&lt;"),
            '>' => out.push_str("&gt;"),
            '"' => out.push_str("&quot;"),
            '\t' | '\n' | '\r' => out.push(' '),
            '\u{0}'..='\u{1f}' | '\u{fffe}' | '\u{ffff}' => {}
            _ => out.push(letter),
        }
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_are_short_and_never_a_minus_zero() {
        let said = |x: f64| Px(x).to_string();
        assert_eq!(
            [said(1.0), said(0.126), said(-0.001), said(1e-9), said(-3.5)],
            ["1", "0.13", "0", "0", "-3.5"]
        );
        assert_eq!([said(f64::NAN), said(f64::INFINITY)], ["0", "0"]);
        assert_eq!(Part(2.0).to_string(), "1");
    }

    #[test]
    fn names_cannot_break_the_file() {
        let mut svg = SvgPainter::new("a\"b<", 10.0, 10.0);
        let style = TextStyle {
            size: 12.0,
            weight: Weight::Bold,
            colour: Colour::BLACK,
            anchor: Anchor::End,
            rim: Some(Colour::WHITE),
        };
        svg.text("</text><script>&\u{1}\"", (1.0, 2.0), &style);
        let file = svg.finish("<t>", "\u{0}d");
        assert!(!file.contains("<script") && !file.contains('\u{1}') && file.contains("id=\"ab-title\""));
        assert!(file.contains("&lt;/text&gt;&lt;script&gt;&amp;&quot;"));
    }

    #[test]
    fn an_arc_names_its_ends_and_its_turn() {
        let quarter = Path::default().arc((0.0, 0.0), 10.0, 0.0, std::f64::consts::FRAC_PI_2);
        assert_eq!(written(&quarter), "M10 0L10 0A10 10 0 0 1 0 10");
        let back = Path::default().arc((0.0, 0.0), 10.0, std::f64::consts::PI * 1.5, 0.0).closed();
        assert_eq!(written(&back), "M0 -10L0 -10A10 10 0 1 0 10 0Z");
    }
}
