//! Damaged and hostile texts: each is refused with words, each problem names its place, nothing panics.

#[path = "hostile/keys.rs"]
mod keys;
#[path = "hostile/kit.rs"]
mod kit;
#[path = "hostile/rules.rs"]
mod rules;
#[path = "hostile/texts.rs"]
mod texts;
#[path = "hostile/values.rs"]
mod values;

use kit::{Row, good};

/// The rows of all tables.
fn rows() -> Vec<Row> {
    let tables = [
        values::numbers(),
        values::retyped(),
        values::words(),
        values::sizes(),
        keys::removed(),
        keys::unknown(),
        keys::twice(),
        texts::no_json(),
        texts::no_scenario(),
        texts::versions(),
        rules::faces(),
        rules::over_time(),
        rules::starts(),
        rules::layers(),
        rules::conditions(),
    ];
    tables.into_iter().flatten().collect()
}

#[test]
fn more_than_200_hostile_texts_are_refused_with_words_and_places() {
    let rows = rows();
    let faults: Vec<String> = rows.iter().filter_map(Row::fault).collect();
    assert!(faults.is_empty(), "{} of {}:\n{}", faults.len(), rows.len(), faults.join("\n"));
    assert!(rows.len() >= 200, "only {} texts", rows.len());
}

#[test]
fn the_undamaged_text_is_accepted_with_and_without_byte_order_mark() {
    let text = good().to_string();
    assert!(stillheat::solve(&text).is_ok());
    assert!(stillheat::solve(&format!("\u{feff}{text}")).is_ok());
}
