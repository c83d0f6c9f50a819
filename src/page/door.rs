//! The door: what the page's scripts can call. `www/types.d.ts` says the same for them.

use super::canvas::Canvas;
use super::entry;
use crate::answer::Report;
use crate::film::choices;
use crate::item::layer_name;
use crate::matter::library::{self, Phase};
use crate::picture::{self, Colour, Shown, Theme};
use crate::problem::{Problem, Severity, Trouble};
use crate::scenario::{self, Number, limits};
use crate::units::quantity::System;
use crate::{Solved, solve};
use serde::Serialize;
use serde_json::Value;
use std::cell::RefCell;
use wasm_bindgen::prelude::*;
use web_sys::CanvasRenderingContext2d;

thread_local! {
    static LAST_BUG: RefCell<String> = const { RefCell::new(String::new()) };
}

/// What the core said when it last failed by its own fault; empty when it never did.
#[wasm_bindgen]
pub fn last_bug() -> String {
    LAST_BUG.with_borrow(Clone::clone)
}

/// A plain JavaScript object.
fn object(value: &impl Serialize) -> JsValue {
    value.serialize(&serde_wasm_bindgen::Serializer::json_compatible()).unwrap_or(JsValue::NULL)
}

fn system(word: &str) -> System {
    if word == "us" { System::Us } else { System::Metric }
}

/// A problem as the page shows it.
#[derive(Serialize)]
struct Shortcoming<'a> {
    severity: Severity,
    path: &'a str,
    message: String,
    hint: String,
    kind: &'static str,
}

impl<'a> Shortcoming<'a> {
    fn new(problem: &'a Problem) -> Self {
        let message = match &problem.trouble {
            Trouble::Missing { what } => what.clone(),
            other => other.to_string(),
        };
        let kind = match &problem.trouble {
            Trouble::Missing { .. } | Trouble::TooFew { .. } => "needed",
            Trouble::UnknownKey { .. } => "unknown",
            Trouble::NotJson { .. } | Trouble::Repeated { .. } | Trouble::NewerVersion { .. } => "text",
            Trouble::WrongType { .. } | Trouble::TooMany { .. } if problem.path.is_empty() => "text",
            _ => "value",
        };
        Self { severity: problem.severity, path: &problem.path, message, hint: problem.hint(), kind }
    }
}

#[derive(Serialize)]
struct Solution<'a> {
    problems: Vec<Shortcoming<'a>>,
    report: Option<&'a Report>,
}

#[derive(Serialize)]
struct Moment {
    words: String,
    iso: String,
}

/// The last scenario that was answered, so that its pictures stay while an entry is mended.
#[wasm_bindgen]
pub struct Page {
    solved: Option<Solved>,
}

#[wasm_bindgen]
impl Page {
    /// A page that has answered nothing yet.
    #[wasm_bindgen(constructor)]
    pub fn new() -> Self {
        std::panic::set_hook(Box::new(|bug| LAST_BUG.set(bug.to_string())));
        Self { solved: None }
    }

    /// Answers a scenario: `{problems, report}`, the report none where problems stop it.
    pub fn solve(&mut self, text: &str) -> JsValue {
        match solve(text) {
            Ok(solved) => {
                let report = &self.solved.insert(solved).report;
                object(&Solution { problems: Vec::new(), report: Some(report) })
            }
            Err(problems) => {
                let problems = problems.iter().map(Shortcoming::new).collect();
                object(&Solution { problems, report: None })
            }
        }
    }

    /// Lets go of the last answer.
    pub fn forget(&mut self) {
        self.solved = None;
    }

    /// Draws a picture of the last answer at a time, s, on a canvas of a size in CSS px.
    #[allow(clippy::too_many_arguments, reason = "one call a picture, made of plain numbers and words")]
    pub fn draw(
        &self,
        name: &str,
        context: CanvasRenderingContext2d,
        width: f64,
        height: f64,
        ratio: f64,
        time: f64,
        theme: &str,
        system_word: &str,
    ) {
        let Some(solved) = &self.solved else { return };
        let (theme, paper) = match theme {
            "dark" => (Theme::Dark, Theme::Dark.inks().paper),
            "print" => (Theme::Light, Colour(255, 255, 255)),
            _ => (Theme::Light, Theme::Light.inks().paper),
        };
        let shown = Shown::new(solved, system(system_word));
        let mut canvas = Canvas::new(context, ratio, (width, height), paper);
        picture::draw(&mut canvas, name, (width, height), theme, &shown, time);
    }

    /// The height that a picture looks best at, CSS px, for a width.
    pub fn height(&self, name: &str, width: f64, system_word: &str) -> f64 {
        self.solved
            .as_ref()
            .map_or(0.0, |solved| picture::height(name, width, &Shown::new(solved, system(system_word))))
    }

    /// What there is to see in a picture at a time, s, in words.
    pub fn description(&self, name: &str, time: f64, system_word: &str) -> String {
        let Some(solved) = &self.solved else { return String::new() };
        picture::description(name, &Shown::new(solved, system(system_word)), time)
    }

    /// The numbers of a picture at a time, s: `{caption, columns, rows}`.
    pub fn table(&self, name: &str, time: f64, system_word: &str) -> JsValue {
        let Some(solved) = &self.solved else { return JsValue::NULL };
        object(&picture::table(name, &Shown::new(solved, system(system_word)), time))
    }

    /// A time after the stop, s, in words and as a date: `{words, iso}`.
    pub fn moment(&self, time: f64) -> JsValue {
        let Some(solved) = &self.solved else { return JsValue::NULL };
        let words = Shown::new(solved, System::Metric).moment_words(time);
        let then = solved.checked.clock.and_then(|clock| clock.after(time));
        object(&Moment { words, iso: then.map_or_else(String::new, crate::units::clock::Clock::iso) })
    }
}

#[derive(Serialize)]
#[serde(untagged)]
enum Reading {
    Read { written: Value, understood: String },
    Wrong { message: String },
}

/// What a text of a kind of field says: `{written, understood}`, or `{message}` where it cannot be read.
#[wasm_bindgen]
pub fn read(text: &str, kind: &str, system_word: &str) -> JsValue {
    let system = system(system_word);
    object(&match entry::read(text, kind, system) {
        Ok(written) => Reading::Read { understood: entry::write(&written, kind, system), written },
        Err(message) => Reading::Wrong { message },
    })
}

/// A value of the file, as JSON, in the words of a kind of field.
#[wasm_bindgen]
pub fn write(written: &str, kind: &str, system_word: &str) -> String {
    let value = serde_json::from_str(written).unwrap_or_default();
    entry::write(&value, kind, system(system_word))
}

/// The text one step of its number up or down.
#[wasm_bindgen]
pub fn step(text: &str, kind: &str, system_word: &str, up: bool, large: bool) -> Option<String> {
    entry::step(text, kind, system(system_word), up, large)
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

/// The library, in its order.
#[wasm_bindgen]
pub fn materials() -> JsValue {
    let one = |one: library::Material| Material {
        id: one.id,
        name: one.name,
        group: one.group,
        liquid: one.phase == Phase::Liquid,
        source: one.source,
        notes: one.notes,
    };
    object(&library::materials().map(one).collect::<Vec<_>>())
}

/// What the layers of a scenario are called, from the inside out; `layers` is their JSON, finished or not.
#[wasm_bindgen]
pub fn layer_names(layers: &str) -> Vec<String> {
    let layers: Vec<Value> = serde_json::from_str(layers).unwrap_or_default();
    let name = |(number, layer): (usize, &Value)| {
        let material = layer["material"].as_str().and_then(library::material);
        layer_name(layer["name"].as_str(), material.map(|material| material.name), number)
    };
    layers.iter().enumerate().map(name).collect()
}

#[derive(Serialize)]
struct Choice {
    words: &'static str,
    written: Number,
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
    let written = |one: &choices::Choice| {
        if one.low < one.high {
            Number::Spread { value: one.likely, low: one.low, high: one.high }
        } else {
            Number::Plain(one.likely)
        }
    };
    let one = |one: &choices::Choice| Choice { words: one.words, written: written(one), source: one.source };
    object(&all.iter().map(one).collect::<Vec<_>>())
}

#[derive(Serialize)]
struct Example {
    title: &'static str,
    about: String,
    text: &'static str,
}

/// The scenarios to start from; the notes of each say what it is about.
#[wasm_bindgen]
pub fn examples() -> JsValue {
    let about = |text| scenario::read(text).ok().and_then(|scenario| scenario.notes).unwrap_or_default();
    let one = |one: &scenario::Example| Example { title: one.title, about: about(one.text), text: one.text };
    object(&scenario::examples().iter().map(one).collect::<Vec<_>>())
}

/// Bytes of a file at most.
#[wasm_bindgen]
pub fn most_bytes() -> usize {
    limits::FILE_BYTES
}
