//! The door to the page: text in, plain objects out. No rule and no formula; it calls what the other rooms have.

mod canvas;

use crate::film::choices;
use crate::matter::library;
use crate::picture::{self, Shown, Theme};
use crate::problem::Problem;
use crate::units::pairs::{read_pairs, write_pairs};
use crate::units::quantity::{self, Kind, System};
use crate::{Solved, answer, scenario, solve};
use canvas::Canvas;
use serde::Serialize;
use wasm_bindgen::prelude::*;
use web_sys::CanvasRenderingContext2d;

/// The page's own state: the last scenario that was answered, so that its pictures stay while an entry is mended.
#[wasm_bindgen]
#[derive(Default)]
pub struct Page {
    solved: Option<Solved>,
}

/// What comes back from a scenario.
#[derive(Serialize)]
struct Solution<'a> {
    problems: &'a [Problem],
    report: Option<&'a answer::Report>,
}

#[wasm_bindgen]
impl Page {
    /// A page that has answered nothing yet.
    #[wasm_bindgen(constructor)]
    pub fn new() -> Self {
        Self::default()
    }

    /// Answers a scenario: `{problems, report}`, the report none where problems stop it.
    pub fn solve(&mut self, text: &str) -> JsValue {
        match solve(text) {
            Ok(solved) => {
                let report = &self.solved.insert(solved).report;
                object(&Solution { problems: &[], report: Some(report) })
            }
            Err(problems) => object(&Solution { problems: &problems, report: None }),
        }
    }

    /// Draws a picture of the last answer at a moment, s, on a canvas of a size in CSS px.
    #[allow(
        clippy::too_many_arguments,
        reason = "one call per picture; an object would have to be taken apart"
    )]
    pub fn draw(
        &self,
        name: &str,
        context: CanvasRenderingContext2d,
        width: f64,
        height: f64,
        ratio: f64,
        time: f64,
        dark: bool,
        us: bool,
    ) {
        let Some(solved) = &self.solved else { return };
        let theme = if dark { Theme::Dark } else { Theme::Light };
        let shown = Shown::new(solved, system(us));
        let mut canvas = Canvas::new(context, ratio, (width, height), theme.inks().paper);
        picture::draw(&mut canvas, name, (width, height), theme, &shown, time);
    }

    /// The numbers of a picture at a moment: `{caption, columns, rows}`.
    pub fn table(&self, name: &str, time: f64, us: bool) -> JsValue {
        let Some(solved) = &self.solved else { return JsValue::NULL };
        object(&picture::table(name, &Shown::new(solved, system(us)), time))
    }

    /// A moment in words.
    pub fn moment_words(&self, time: f64) -> String {
        self.solved
            .as_ref()
            .map_or_else(String::new, |solved| Shown::new(solved, System::Metric).moment_words(time))
    }
}

fn system(us: bool) -> System {
    if us { System::Us } else { System::Metric }
}

/// A plain JavaScript object.
fn object(value: &impl Serialize) -> JsValue {
    value.serialize(&serde_wasm_bindgen::Serializer::json_compatible()).unwrap_or(JsValue::NULL)
}

#[derive(Serialize)]
#[serde(untagged)]
enum Understood {
    Written { value: f64, low: Option<f64>, high: Option<f64> },
    Wrong { problem: String },
}

#[derive(Serialize)]
#[serde(untagged)]
enum Pairs {
    Written { at: Vec<f64>, values: Vec<f64> },
    Wrong { problem: String },
}

/// The kind of a field; the page's own markup names it.
fn kind(word: &str) -> Kind {
    Kind::named(word).unwrap_or(Kind::Emissivity)
}

/// What a text says: `{value, low, high}` in the unit of the file, or `{problem}`.
#[wasm_bindgen]
pub fn read_quantity(text: &str, kind_word: &str, us: bool) -> JsValue {
    object(&match quantity::read(text, kind(kind_word), system(us)) {
        Ok(written) => Understood::Written { value: written.value, low: written.low, high: written.high },
        Err(problem) => Understood::Wrong { problem },
    })
}

/// A quantity as text: exactly in metric units, rounded where it was converted.
#[wasm_bindgen]
pub fn write_quantity(value: f64, low: Option<f64>, high: Option<f64>, kind_word: &str, us: bool) -> String {
    let write = if us { quantity::show } else { quantity::write };
    write(value, low, high, kind(kind_word), system(us))
}

/// The text one step of its number up or down.
#[wasm_bindgen]
pub fn step_quantity(text: &str, kind_word: &str, us: bool, up: bool, large: bool) -> Option<String> {
    quantity::step(text, kind(kind_word), system(us), up, large)
}

/// What a table in text says: `{at, values}` in the units of the file, or `{problem}`.
#[wasm_bindgen(js_name = read_pairs)]
pub fn pairs_in(text: &str, at: &str, value: &str, us: bool) -> JsValue {
    object(&match read_pairs(text, kind(at), kind(value), system(us)) {
        Ok(pairs) => {
            let (at, values) = pairs.into_iter().unzip();
            Pairs::Written { at, values }
        }
        Err(problem) => Pairs::Wrong { problem },
    })
}

/// A table as text.
#[wasm_bindgen(js_name = write_pairs)]
pub fn pairs_out(at: &[f64], values: &[f64], at_kind: &str, value_kind: &str, us: bool) -> String {
    let pairs: Vec<(f64, f64)> = at.iter().copied().zip(values.iter().copied()).collect();
    write_pairs(&pairs, kind(at_kind), kind(value_kind), system(us))
}

#[derive(Serialize)]
struct Material {
    id: &'static str,
    name: &'static str,
    group: &'static str,
    liquid: bool,
    source: &'static str,
    notes: &'static str,
}

/// The library, for the form.
#[wasm_bindgen]
pub fn materials() -> JsValue {
    let all: Vec<Material> = library::materials()
        .map(|one| Material {
            id: one.id,
            name: one.name,
            group: one.group,
            liquid: one.phase == library::Phase::Liquid,
            source: one.source,
            notes: one.notes,
        })
        .collect();
    object(&all)
}

#[derive(Serialize)]
struct Choice {
    words: &'static str,
    low: f64,
    likely: f64,
    high: f64,
    source: &'static str,
}

/// Everyday choices in words for a kind of field.
#[wasm_bindgen(js_name = choices)]
pub fn everyday_choices(of: &str) -> JsValue {
    let all = match of {
        "film" => choices::FILM,
        "inside_film" => choices::INSIDE_FILM,
        "emissivity" => choices::EMISSIVITY,
        "contact" => choices::CONTACT,
        _ => &[],
    };
    let all: Vec<Choice> = all
        .iter()
        .map(|one| Choice {
            words: one.words,
            low: one.low,
            likely: one.likely,
            high: one.high,
            source: one.source,
        })
        .collect();
    object(&all)
}

#[derive(Serialize)]
struct Example {
    id: &'static str,
    title: &'static str,
    text: &'static str,
}

/// The scenarios to start from.
#[wasm_bindgen]
pub fn examples() -> JsValue {
    let all: Vec<Example> = scenario::examples()
        .iter()
        .map(|one| Example { id: one.id, title: one.title, text: one.text })
        .collect();
    object(&all)
}
