//! Numbers as pictures show them: two sets of units.

use super::celsius;
use super::quantity::System;
use super::words;

/// 1 in = 25.4 mm, exact (international yard and pound agreement 1959).
const INCH: f64 = 0.0254;

impl System {
    /// A temperature in K as the number shown.
    pub fn temperature(self, kelvin: f64) -> f64 {
        match self {
            Self::Metric => celsius(kelvin),
            Self::Us => celsius(kelvin) * 1.8 + 32.0,
        }
    }

    /// "°C" or "°F"
    pub fn temperature_unit(self) -> &'static str {
        match self {
            Self::Metric => "°C",
            Self::Us => "°F",
        }
    }

    /// A temperature in K in words.
    pub fn temperature_words(self, kelvin: f64) -> String {
        match self {
            Self::Metric => words::temperature(kelvin),
            Self::Us => format!("{:.0} °F", self.temperature(kelvin)),
        }
    }

    /// A length in m as the number shown.
    pub fn length(self, metre: f64) -> f64 {
        match self {
            Self::Metric => metre * 1e3,
            Self::Us => metre / INCH,
        }
    }

    /// "mm" or "in"
    pub fn length_unit(self) -> &'static str {
        match self {
            Self::Metric => "mm",
            Self::Us => "in",
        }
    }
}

/// A length in m in words, to three digits: "400 mm", "0.315 in".
pub fn length_words(metre: f64, system: System) -> String {
    let shown = system.length(metre);
    let text = if shown >= 100.0 {
        format!("{shown:.0}")
    } else if shown >= 10.0 {
        format!("{shown:.1}")
    } else if shown >= 1.0 {
        format!("{shown:.2}")
    } else {
        format!("{shown:.3}")
    };
    let text =
        if text.contains('.') { text.trim_end_matches('0').trim_end_matches('.').to_owned() } else { text };
    format!("{text} {}", system.length_unit())
}
