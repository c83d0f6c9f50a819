//! The JSON Schema of the file, made from its types (JSON Schema 2020-12).

use super::Scenario;

/// The schema as text.
pub fn schema() -> String {
    let schema = schemars::schema_for!(Scenario);
    let mut text = serde_json::to_string_pretty(&schema).unwrap_or_default();
    text.push('\n');
    text
}
