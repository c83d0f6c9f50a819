//! From a checked item to its answers: ready time, standing time, numerical band, heat balance.

mod report;

pub use report::*;
