//! Units in and out, and how temperatures, times and dates are said in words.
//!
//! Inside the program everything is SI and kelvin; this room is where degrees Celsius and the units that
//! people write come in and go out.

pub mod clock;
pub mod display;
pub mod pairs;
pub mod polynomial;
pub mod quantity;
pub mod words;

/// 0 °C in K, exact (SI brochure, 9th edition, 2019, section 2.3.1).
const ZERO_CELSIUS: f64 = 273.15;

/// A temperature in °C as one in K.
pub fn kelvin(celsius: f64) -> f64 {
    celsius + ZERO_CELSIUS
}

/// A temperature in K as one in °C.
pub fn celsius(kelvin: f64) -> f64 {
    kelvin - ZERO_CELSIUS
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn celsius_and_kelvin_undo_each_other() {
        assert_relative_eq!(kelvin(0.0), 273.15);
        // One rounding each way near 300 K: 6e-14 K.
        assert_relative_eq!(celsius(kelvin(63.2)), 63.2, epsilon = 1e-13);
        assert_relative_eq!(celsius(0.0), -273.15);
    }
}
