//! Answers as JSON and as text to read.

use super::tasks::Outcome;
use std::fmt::Write;
use stillheat::answer::Report;

/// A JSON list, one entry a file.
pub fn json(outcomes: &[Outcome]) -> String {
    match serde_json::to_string_pretty(outcomes) {
        Ok(text) => text + "\n",
        Err(error) => format!("{{\"internal\": \"{error}\"}}\n"),
    }
}

/// Text to read, one block a file.
pub fn all(outcomes: &[Outcome]) -> String {
    let blocks: Vec<String> = outcomes.iter().map(one).collect();
    blocks.join("\n")
}

fn one(outcome: &Outcome) -> String {
    match outcome {
        Outcome::Answered { file, report } => answered(file, report),
        Outcome::Problems { file, problems } => {
            let lines: Vec<String> = problems.iter().map(|problem| format!("  {problem}\n")).collect();
            format!("{file}: cannot be answered\n{}", lines.concat())
        }
        Outcome::Unreadable { file, unreadable } => format!("{file}: {unreadable}\n"),
    }
}

fn answered(file: &str, report: &Report) -> String {
    let title = if report.title.is_empty() { file } else { &report.title };
    let mut text = format!("{title}\n  {}\n  {}\n", report.headline, report.detail);
    // Writing into a string cannot fail.
    for one in &report.ready_when {
        let _ = writeln!(text, "  ready when {}: {}", one.words, one.outcome_words);
    }
    for one in &report.must_not {
        let _ = writeln!(text, "  must not: {}: {}", one.words, one.outcome_words);
    }
    for (name, value) in &report.checks {
        let _ = writeln!(text, "  {name}: {value}");
    }
    for one in &report.by_hand {
        let holds = if one.holds { "holds" } else { "does not hold" };
        let _ = writeln!(text, "  by hand, {}: {} ({holds}: {})", one.name, one.gives, one.validity);
    }
    for warning in &report.warnings {
        let _ = writeln!(text, "  worth knowing: {warning}");
    }
    for caution in &report.cautions {
        let _ = writeln!(text, "  caution: {caution}");
    }
    text
}
