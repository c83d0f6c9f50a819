//! The file as written: one JSON document, `"stillheat": 1`.
//!
//! These types say what a file can say and nothing about whether it can be solved; that is [`crate::item`].
//! Every key carries its unit in lower case. An uncertain number is an object with `value`, `low`, `high`
//! in the place of the plain number. The JSON Schema is made from these types (`schema`), the reader that
//! reports all problems at once is `read`.

mod at;
mod examples;
mod json;
pub mod limits;
mod nearest;
mod read;
mod read_faces;
mod read_layers;
#[cfg(not(target_arch = "wasm32"))]
mod schema;
mod types;

pub use examples::{Example, examples};
pub use nearest::nearest;
pub use read::{attempt, read};
#[cfg(not(target_arch = "wasm32"))]
pub use schema::schema;
pub use types::*;
