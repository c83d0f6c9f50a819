//! Texts that are no JSON, or not a scenario at all.

use super::kit::{Row, good, put};
use serde_json::{Value, json};

/// Texts that are no JSON: what is damaged, how, and what the message says with line and column.
const DAMAGED: &[(&str, &str, &str)] = &[
    ("\"stillheat\": 1", "\"stillheat\": 01", "line 2, column 17"),
    ("\"stillheat\": 1", "'stillheat': 1", "line 2, column 3"),
    ("\"stillheat\": 1", "stillheat: 1", "line 2, column 3"),
    ("\"stillheat\": 1", "\"stillheat\" = 1", "line 2, column 15"),
    ("\"stillheat\": 1,", "\"stillheat\": 1", "line 3, column 3"),
    ("\"stillheat\": 1,", "\"stillheat\": 1,,", "line 2, column 18"),
    ("\"stillheat\": 1", "// a comment\n\"stillheat\": 1", "line 2, column 3"),
    ("\"stillheat\": 1", "\"stillheat\": NaN", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": Infinity", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": -Infinity", "line 2, column 17"),
    ("\"stillheat\": 1", "\"stillheat\": +1", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": 0x1", "line 2, column 17"),
    ("\"stillheat\": 1", "\"stillheat\": .1", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": 1.", "line 2, column 18"),
    ("\"stillheat\": 1", "\"stillheat\": 1e", "line 2, column 18"),
    ("\"stillheat\": 1", "\"stillheat\": True", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": undefined", "line 2, column 16"),
    ("\"stillheat\": 1", "\"stillheat\": 1e400", "line 2, column"),
    ("\"stillheat\": 1", "\"stillheat\": -1e400", "line 2, column"),
    ("\"stillheat\": 1", "\"stillheat\": 1\u{0}", "line 2, column 17"),
    ("Lined furnace", "Lined \u{0}furnace", "line 3, column"),
    ("Lined furnace", "Lined \nfurnace", "line 4, column"),
    ("Lined furnace", "Lined \\x furnace", "line 3, column 20"),
    ("Lined furnace", "Lined \\u12G4 furnace", "line 3, column"),
    ("Lined furnace", "Lined \\ud800 furnace", "line 3, column"),
    ("Lined furnace", "Lined\" furnace", "line 3, column 20"),
    ("Lined furnace, burner", "°°°°\\x", "line 3, column 18"),
    ("\"slab\"", "\"slab", "line"),
    ("[", "(", "line"),
    ("]", "}", "line"),
];

pub fn no_json() -> Vec<Row> {
    let pretty = serde_json::to_string_pretty(&good()).expect("a value is text");
    let row = |&(from, to, says): &(&str, &str, &str)| {
        assert!(pretty.contains(from), "{from} is in the scenario");
        Row::text(to, pretty.replacen(from, to, 1), &[""], says)
    };
    let mut rows: Vec<Row> = DAMAGED.iter().map(row).collect();
    // Cut off at many places: none of the beginnings is whole.
    let ends = (0..pretty.trim_end().len()).step_by(53).filter(|&end| pretty.is_char_boundary(end));
    rows.extend(ends.map(|end| Row::text(format!("cut at {end}"), &pretty[..end], &[""], "line")));
    rows
}

/// Whole documents that are no scenario.
pub fn no_scenario() -> Vec<Row> {
    let deep = |bracket: &str| bracket.repeat(10_000);
    let whole = |text: &str, says: &str| Row::text(format!("{text:.40}"), text, &[""], says);
    let mut rows = vec![
        whole("", "line 1, column 1"),
        whole("\u{feff}", "line 1, column 1"),
        whole(" \n\t\n", "line 3"),
        whole("\u{0}", "line 1, column 1"),
        whole("null", "an object with the key \"stillheat\" is expected"),
        whole("true", "an object with the key \"stillheat\" is expected"),
        whole("1", "an object with the key \"stillheat\" is expected"),
        whole("\"stillheat\"", "an object with the key \"stillheat\" is expected"),
        whole("[]", "an object with the key \"stillheat\" is expected"),
        whole("{}", "\"stillheat\": 1 says that this is a scenario"),
        whole("{\"Stillheat\": 1}", "\"stillheat\": 1 says that this is a scenario"),
        whole("{} {}", "line 1, column 4"),
        whole("{\"stillheat\": 1}}", "line 1, column 17"),
        whole("<!doctype html>", "line 1, column 1"),
        whole("PK\u{3}\u{4}", "line 1, column 1"),
        whole("stillheat,1\r\n", "line 1, column 1"),
        whole(&deep("["), "nest deeper than 16"),
        whole(&deep("{\"a\":"), "nest deeper than 16"),
        whole(&deep("[{\"item\":"), "nest deeper than 16"),
        whole(&format!("{}{}", deep("["), deep("]")), "nest deeper than 16"),
        whole(&" ".repeat(1_000_001), "1000001 bytes; at most 1000000"),
        whole(&format!("[{}1]", "1,".repeat(400_000)), "a list of 400001 found"),
    ];
    // A long key with very many values in it costs no more than its letters.
    let long = "k".repeat(450_000);
    let says = "\"stillheat\": 1 says that this is a scenario";
    rows.push(whole(&format!("{{\"{long}\": [{}1]}}", "1,".repeat(250_000)), says));
    let bare = "{\"stillheat\": 1}";
    rows.push(Row::text(bare, bare, &["/item", "/start", "/surroundings"], "missing"));
    rows
}

/// Versions that this program does not read.
pub fn versions() -> Vec<Row> {
    let cases = [
        (json!(0), "never existed"),
        (json!(2), "newer program"),
        (json!(u64::MAX), "newer program"),
        (json!(-1), "a whole number"),
        (json!(1.5), "a whole number"),
        (json!("1"), "a whole number"),
        (json!([1]), "a whole number"),
        (json!(1e300), "a whole number"),
    ];
    let row = |(version, says): (Value, &str)| {
        let mut scenario = good();
        put(&mut scenario, "/stillheat", version.clone());
        // What a newer file may hold is not complained about.
        put(&mut scenario, "/hologram", json!({}));
        Row::new(format!("version {version}"), &scenario, &["/stillheat"], says)
    };
    cases.into_iter().map(row).collect()
}
