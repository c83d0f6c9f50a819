//! Material properties over temperature, and the library of materials with their sources.

mod law;
pub mod library;

pub use law::Law;
