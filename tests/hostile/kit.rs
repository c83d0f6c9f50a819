//! A damaged text and the places its problems must name.

use serde_json::Value;
use stillheat::problem::{Problem, Severity};

/// A text that must be refused.
pub struct Row {
    /// What is wrong with it, for the failure message.
    pub name: String,
    /// The text.
    pub text: String,
    /// The JSON Pointers of all its problems, in any order.
    pub places: Vec<String>,
    /// What one of the messages says.
    pub says: String,
}

/// The scenario that is damaged: several layers, both faces, an earlier steady state, a probe.
pub fn good() -> Value {
    let examples = stillheat::scenario::examples();
    let example = examples.iter().find(|example| example.id == "furnace-wall");
    serde_json::from_str(example.expect("the example is there").text).expect("an example is JSON")
}

/// The good scenario with some values put in place of others, or added.
pub fn with(changes: &[(&str, Value)]) -> Value {
    let mut scenario = good();
    for (pointer, value) in changes {
        put(&mut scenario, pointer, value.clone());
    }
    scenario
}

/// Puts a value in place of the one there; an object that has no such key gets it.
pub fn put(scenario: &mut Value, pointer: &str, value: Value) {
    if let Some(place) = scenario.pointer_mut(pointer) {
        *place = value;
        return;
    }
    let (parent, key) = pointer.rsplit_once('/').expect("a pointer begins with a slash");
    let parent = scenario.pointer_mut(parent).and_then(Value::as_object_mut);
    parent.unwrap_or_else(|| panic!("{pointer} has no object above it")).insert(key.to_owned(), value);
}

/// Takes a key away.
pub fn take(scenario: &mut Value, pointer: &str) {
    let (parent, key) = pointer.rsplit_once('/').expect("a pointer begins with a slash");
    let parent = scenario.pointer_mut(parent).and_then(Value::as_object_mut);
    let taken = parent.and_then(|parent| parent.remove(key));
    assert!(taken.is_some(), "{pointer} is not there to be removed");
}

impl Row {
    /// A damaged scenario.
    pub fn new(name: impl Into<String>, scenario: &Value, places: &[&str], says: &str) -> Self {
        Self::text(name, scenario.to_string(), places, says)
    }

    /// A damaged text.
    pub fn text(name: impl Into<String>, text: impl Into<String>, places: &[&str], says: &str) -> Self {
        let places = places.iter().map(|&place| place.to_owned()).collect();
        Self { name: name.into(), text: text.into(), places, says: says.to_owned() }
    }

    /// What is not as it must be; nothing where all is well.
    pub fn fault(&self) -> Option<String> {
        let problems = match std::panic::catch_unwind(|| stillheat::solve(&self.text)) {
            Err(_) => return Some(format!("{}: panicked", self.name)),
            Ok(Ok(_)) => return Some(format!("{}: accepted", self.name)),
            Ok(Err(problems)) => problems,
        };
        let mut found: Vec<&str> = problems.iter().map(|problem| problem.path.as_str()).collect();
        let mut expected: Vec<&str> = self.places.iter().map(String::as_str).collect();
        found.sort_unstable();
        expected.sort_unstable();
        let all = problems.iter().map(ToString::to_string).collect::<Vec<_>>().join("\n    ");
        let fault = if found != expected {
            format!("places {expected:?} expected")
        } else if !all.contains(&self.says) {
            format!("{:?} expected in the message", self.says)
        } else {
            format!("{:?}", problems.iter().find_map(unworthy)?)
        };
        Some(format!("{}: {fault}, found\n    {all}", self.name))
    }
}

/// A message without words, or too long to be read.
fn unworthy(problem: &Problem) -> Option<String> {
    let message = problem.trouble.to_string();
    let worthy = problem.severity == Severity::Error
        && message.split_whitespace().count() >= 3
        && message.chars().count() <= 1_200
        && !message.chars().any(char::is_control);
    (!worthy).then_some(message)
}
