//! The heat balance of nodes and links, its derivative, its march in time and its steady state.
//!
//! Knows laws, shapes and faces in SI and kelvin; no names, no files, no degrees Celsius.

mod balance;
mod faces;
mod linear;
mod rodas;
mod start;
mod steady;
mod stored;

pub use balance::Balance;
pub use faces::{FaceNow, STEFAN_BOLTZMANN, faces_at};
pub use linear::{Linear, Matrix, Tridiagonal};
pub use rodas::{Attempt, Moment, Rodas};
pub use start::start_temperatures;
pub use steady::{SteadyError, steady};
