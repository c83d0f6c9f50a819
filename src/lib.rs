//! When is a hot (or cold) item at rest ready, how long may it stand, and what would it take?
//!
//! One straight line, each arrow a plain function:
//!
//! ```text
//! scenario (JSON) -> item (SI, checked) -> mesh -> march / steady -> answer -> report, pictures
//! ```
//!
//! The core is a pure function of the scenario: no clock, no randomness, no files, no globals.

pub mod answer;
pub mod conduct;
pub mod item;
pub mod matter;
pub mod mesh;
pub mod picture;
pub mod problem;
pub mod scale;
pub mod scenario;
pub mod units;

#[cfg(target_arch = "wasm32")]
mod page;
