//! Characteristic numbers and hand formulas.
//!
//! Shares nothing with `mesh` and `conduct`, so that it can vouch for them: a temperature that both give has
//! been found in two ways.

pub mod hand;
pub mod lumped;
pub mod mixing;
pub mod numbers;
pub mod series;
pub mod thick;

mod chain;
mod outline;
mod roots;
