//! A painter that draws on a canvas, sharp at any device pixel ratio.

use crate::picture::{Anchor, Colour, Painter, Stroke, Type};
use js_sys::Array;
use wasm_bindgen::JsValue;
use web_sys::CanvasRenderingContext2d;

const FAMILY: &str =
    "ui-sans-serif, system-ui, \"Segoe UI\", Roboto, \"Noto Sans\", \"DejaVu Sans\", sans-serif";

/// A canvas of a size in CSS px.
pub struct Canvas {
    context: CanvasRenderingContext2d,
}

impl Canvas {
    /// Clears a canvas whose pixels are `ratio` times its CSS px.
    pub fn new(context: CanvasRenderingContext2d, ratio: f64, size: (f64, f64), paper: Colour) -> Self {
        // A context that refuses draws nothing; there is nothing to be done about it here.
        let _ = context.set_transform(ratio, 0.0, 0.0, ratio, 0.0, 0.0);
        context.set_fill_style_str(&css(paper));
        context.fill_rect(0.0, 0.0, size.0, size.1);
        context.set_line_join("round");
        Self { context }
    }

    fn path(&self, points: &[(f64, f64)]) {
        self.context.begin_path();
        for (i, (x, y)) in points.iter().enumerate() {
            if i == 0 {
                self.context.move_to(*x, *y);
            } else {
                self.context.line_to(*x, *y);
            }
        }
    }

    fn set(&self, set: Type) {
        let weight = if set.bold { "600 " } else { "" };
        self.context.set_font(&format!("{weight}{}px {FAMILY}", set.size));
    }
}

impl Painter for Canvas {
    fn fill(&mut self, points: &[(f64, f64)], colour: Colour) {
        self.context.set_fill_style_str(&css(colour));
        self.path(points);
        self.context.close_path();
        self.context.fill();
    }

    fn line(&mut self, points: &[(f64, f64)], stroke: Stroke) {
        self.context.set_stroke_style_str(&css(stroke.colour));
        self.context.set_line_width(stroke.width);
        let dash: Array = stroke.dash.iter().map(|length| JsValue::from_f64(*length)).collect();
        let _ = self.context.set_line_dash(&dash);
        self.path(points);
        self.context.stroke();
    }

    fn text(&mut self, at: (f64, f64), text: &str, set: Type) {
        self.set(set);
        self.context.set_text_align(match set.anchor {
            Anchor::Start => "left",
            Anchor::Middle => "center",
            Anchor::End => "right",
        });
        self.context.set_fill_style_str(&css(set.colour));
        let _ = self.context.fill_text(text, at.0, at.1);
    }

    fn width_of(&self, text: &str, set: Type) -> f64 {
        self.set(set);
        self.context.measure_text(text).map_or(0.0, |metrics| metrics.width())
    }
}

fn css(colour: Colour) -> String {
    format!("rgb({} {} {})", colour.0, colour.1, colour.2)
}
