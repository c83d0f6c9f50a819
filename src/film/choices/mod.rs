//! Everyday choices in words for what nobody measures, each with its range and where that comes from.
//!
//! The form offers them and fills in `low` to `high`; nothing is calculated from the words. Ranges that a
//! formula gives are held against that formula in the tests of this room.

mod contact;
mod emissivity;
mod inside;
mod outside;
#[cfg(test)]
mod tests;

pub use contact::CONTACT;
pub use emissivity::EMISSIVITY;
pub use inside::INSIDE_FILM;
pub use outside::FILM;

/// One everyday choice.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Choice {
    /// What one would say: "still air indoors (convection only)".
    pub words: &'static str,
    /// Hardly lower than this, in the unit of its list.
    pub low: f64,
    /// The likely value.
    pub likely: f64,
    /// Hardly higher than this.
    pub high: f64,
    /// Where the range comes from, or "common practice, no source".
    pub source: &'static str,
}

const fn choice(words: &'static str, low: f64, likely: f64, high: f64, source: &'static str) -> Choice {
    Choice { words, low, likely, high, source }
}
