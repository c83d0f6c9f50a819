//! Quantities as people write them on paper, read and written.
//!
//! ```
//! use stillheat::units::quantity::{Kind, System, Written, read, write};
//!
//! let film = read("6 to 12 Btu/h ft² °F", Kind::Film, System::Metric).unwrap();
//! assert_eq!(film.low.map(f64::round), Some(34.0));
//! let wall = read("0,4 m", Kind::Length, System::Metric).unwrap();
//! assert_eq!(wall, Written::plain(0.4));
//! assert_eq!(write(wall.value, wall.low, wall.high, Kind::Length, System::Metric), "400 mm");
//! ```
//!
//! What is read and written:
//! - a number and its unit; without a unit the one that is shown for the kind counts ([`unit()`]);
//! - known roughly: `6 to 12`, `6-12`, `6 – 12`, `6..12` (the value is the middle, not the geometric mean),
//!   `8 ± 2`, `8 +- 2`, `8 +/- 2`, `8 ± 25 %`, or all three: `8 (6 to 12)`;
//! - units in any arrangement: `W/m²K`, `W/(m2 K)`, `W/m^2/K`; all that follows a stroke is below it;
//! - lengths and times in parts: `2 h 30 min`, `1'6"`; times as on a clock: `2:30`; fractions: `3 1/2 in`.
//!
//! The marks in a number: a point is a decimal point. A comma is a decimal comma. Where both stand, the last is
//! the decimal mark and the other separates thousands; a mark that stands several times separates thousands, and
//! so does a space before three digits. One comma alone before three digits (`1,200`) could be either: it is
//! refused, with both readings named.

mod kind;
mod number;
mod phrase;
mod read;
mod step;
#[cfg(test)]
mod tests;
mod unit;
mod write;

pub use kind::{Kind, System, unit};
pub use read::{Written, read};
pub use step::step;
pub use write::{show, write};
