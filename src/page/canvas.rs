//! A painter that draws on a canvas, sharp at any device pixel ratio.

use crate::picture::{Anchor, Colour, Fill, Painter, Path, Point, RIM, Step, Stroke, TextStyle, Weight};
use js_sys::Array;
use wasm_bindgen::JsValue;
use web_sys::{CanvasGradient, CanvasRenderingContext2d};

const FAMILY: &str =
    "ui-sans-serif, system-ui, \"Segoe UI\", Roboto, \"Noto Sans\", \"DejaVu Sans\", sans-serif";

/// A canvas of a size in CSS px.
pub struct Canvas {
    context: CanvasRenderingContext2d,
    ratio: f64,
}

impl Canvas {
    /// Clears a canvas whose pixels are `ratio` times its CSS px.
    pub fn new(context: CanvasRenderingContext2d, ratio: f64, size: (f64, f64), paper: Colour) -> Self {
        // A context that refuses draws nothing; there is nothing to be done about it here.
        let _ = context.set_transform(ratio, 0.0, 0.0, ratio, 0.0, 0.0);
        context.set_global_alpha(1.0);
        context.set_fill_style_str(&paper.css());
        context.fill_rect(0.0, 0.0, size.0, size.1);
        context.set_line_join("round");
        Self { context, ratio }
    }

    fn trace(&self, path: &Path) {
        let context = &self.context;
        context.begin_path();
        for step in &path.steps {
            match *step {
                Step::Move((x, y)) => context.move_to(x, y),
                Step::Line((x, y)) => context.line_to(x, y),
                Step::Arc { centre: (x, y), radius, from, to } => {
                    let _ = context.arc_with_anticlockwise(x, y, radius, from, to, to < from);
                }
                Step::Close => context.close_path(),
            }
        }
    }

    fn set_font(&self, size: f64, weight: Weight) {
        let weight = match weight {
            Weight::Regular => "",
            Weight::Bold => "600 ",
        };
        self.context.set_font(&format!("{weight}{size}px {FAMILY}"));
    }

    fn fill_with(&self, gradient: &CanvasGradient, stops: &[(f64, Colour)]) {
        for (place, colour) in stops {
            #[allow(clippy::cast_possible_truncation, reason = "a part of a gradient needs no more digits")]
            let place = place.clamp(0.0, 1.0) as f32;
            let _ = gradient.add_color_stop(place, &colour.css());
        }
        self.context.set_fill_style_canvas_gradient(gradient);
        self.context.fill();
    }
}

impl Painter for Canvas {
    fn fill(&mut self, path: &Path, fill: &Fill) {
        self.trace(path);
        match *fill {
            Fill::Plain { colour, opacity } => {
                self.context.set_global_alpha(opacity);
                self.context.set_fill_style_str(&colour.css());
                self.context.fill();
                self.context.set_global_alpha(1.0);
            }
            Fill::Linear { from, to, stops } => {
                let gradient = self.context.create_linear_gradient(from.0, from.1, to.0, to.1);
                self.fill_with(&gradient, stops);
            }
            Fill::Radial { centre: (x, y), radius, stops } => {
                if let Ok(gradient) = self.context.create_radial_gradient(x, y, 0.0, x, y, radius) {
                    self.fill_with(&gradient, stops);
                }
            }
        }
    }

    fn stroke(&mut self, path: &Path, stroke: &Stroke) {
        self.trace(path);
        let dash: Array = stroke.dash.iter().map(|length| JsValue::from_f64(*length)).collect();
        let _ = self.context.set_line_dash(&dash);
        self.context.set_line_width(stroke.width);
        self.context.set_stroke_style_str(&stroke.colour.css());
        self.context.set_global_alpha(stroke.opacity);
        self.context.stroke();
        self.context.set_global_alpha(1.0);
    }

    fn text(&mut self, text: &str, (x, y): Point, style: &TextStyle) {
        self.set_font(style.size, style.weight);
        self.context.set_text_align(match style.anchor {
            Anchor::Start => "left",
            Anchor::Middle => "center",
            Anchor::End => "right",
        });
        if let Some(rim) = style.rim {
            let _ = self.context.set_line_dash(&Array::new());
            self.context.set_line_width(RIM);
            self.context.set_stroke_style_str(&rim.css());
            let _ = self.context.stroke_text(text, x, y);
        }
        self.context.set_fill_style_str(&style.colour.css());
        let _ = self.context.fill_text(text, x, y);
    }

    fn text_width(&self, text: &str, size: f64, weight: Weight) -> f64 {
        self.set_font(size, weight);
        self.context.measure_text(text).map_or(0.0, |metrics| metrics.width())
    }

    fn pixel_ratio(&self) -> f64 {
        self.ratio
    }
}
