//! One table of limits: the check, the message, the form and the schema all read it.

use crate::problem::Limit;

macro_rules! limits {
    (@ from) => { true };
    (@ above) => { false };
    ($($(#[$doc:meta])* $name:ident: $words:literal, $unit:literal, $low:expr, $bound:ident, $high:expr, $hint:literal;)*) => {
        $($(#[$doc])* pub static $name: Limit = Limit {
            name: $words, unit: $unit, lowest: $low, lowest_allowed: limits!(@ $bound), highest: $high, hint: $hint,
        };)*
        /// All of them, by the name of their constant.
        pub static ALL: &[(&str, &Limit)] = &[$((stringify!($name), &$name)),*];
    };
}

limits! {
    /// Thickness of a layer. A film of paint is 20 µm, a silo has a radius of some metres.
    THICKNESS: "a thickness", "m", 1e-6, from, 50.0, "For no layer, remove it.";
    /// Radius of the hollow inside.
    INNER_RADIUS: "an inner radius", "m", 0.0, from, 50.0, "";
    /// Density: gases to heavy metals.
    DENSITY: "a density", "kg/m³", 0.001, from, 30_000.0, "";
    /// Heat capacity: lead has 130, water 4200, hydrogen 14 300.
    HEAT_CAPACITY: "a heat capacity", "J/(kg K)", 10.0, from, 100_000.0, "";
    /// Conductivity: evacuated powder to diamond.
    CONDUCTIVITY: "a conductivity", "W/(m K)", 1e-4, from, 5_000.0, "";
    /// Film coefficient: still gas to boiling.
    FILM: "a film coefficient", "W/(m² K)", 0.0, above, 1e6, "For no heat, set the face to insulated.";
    /// Emissivity.
    EMISSIVITY: "an emissivity", "", 0.0, from, 1.0, "";
    /// Contact resistance.
    CONTACT: "a contact resistance", "m² K/W", 0.0, from, 100.0, "";
    /// Temperature. Below -270 °C nothing of a plant is left, above 3500 °C no lining.
    TEMPERATURE: "a temperature", "°C", -270.0, from, 3_500.0, "";
    /// Temperature difference.
    DIFFERENCE: "a temperature difference", "K", 0.0, above, 4_000.0, "";
    /// Half of highest minus lowest of a cycle.
    AMPLITUDE: "an amplitude", "K", 0.0, from, 2_000.0, "";
    /// Rate of change.
    RATE: "a rate of change", "K/h", 0.0, above, 1e6, "";
    /// Heat flux, either way.
    HEAT_FLUX: "a heat flux", "W/m²", -1e7, from, 1e7, "";
    /// Amplitude of a heat flux.
    FLUX_AMPLITUDE: "an amplitude", "W/m²", 0.0, from, 1e7, "";
    /// Time after the stop; up to 100 years.
    TIME: "a time", "s", 0.0, from, 3.2e9, "";
    /// When a cycle is highest; may lie before the stop.
    WHEN: "a time", "s", -3.2e9, from, 3.2e9, "";
    /// A length of time. Shorter than a millisecond nothing of a plant happens.
    DURATION: "a length of time", "s", 1e-3, from, 3.2e9, "";
    /// Period of what repeats.
    PERIOD: "a period", "s", 1.0, from, 3.2e9, "";
    /// How far to look ahead: a second to ten years.
    LOOK_AHEAD: "the look-ahead", "s", 1.0, from, 3.2e8, "";
    /// A distance inside the item.
    DISTANCE: "a distance", "m", 0.0, from, 1_000.0, "";
    /// A coefficient of a polynomial: its values are checked, not it.
    COEFFICIENT: "a coefficient", "", -1e12, from, 1e12, "";
}

/// Points of a property table and the ends of its range are apart by this at least, K.
pub const TEMPERATURE_STEP: f64 = 1e-3;
/// Rows of a programme and points of a table over time are apart by this at least, s.
pub const TIME_STEP: f64 = 1e-3;
/// Points of a start profile are apart by this at least, m.
pub const PLACE_STEP: f64 = 1e-6;

/// Is the second at least a step above the first? A hair less passes: written decimals are rounded.
pub fn apart(first: f64, second: f64, step: f64) -> bool {
    second - first >= 0.99 * step
}

/// Bytes of a file at most.
pub const FILE_BYTES: usize = 1_000_000;
/// Lists and objects within each other at most.
pub const NESTING: usize = 16;
/// Layers of an item at most.
pub const LAYERS: usize = 20;
/// Rows of the programme of a face at most.
pub const ROWS: usize = 200;
/// Points of a table over time at most.
pub const TABLE_POINTS: usize = 500;
/// Points of a property table or a start profile at most.
pub const PROPERTY_POINTS: usize = 200;
/// Coefficients of a property polynomial at most.
pub const COEFFICIENTS: usize = 6;
/// Probes at most.
pub const PROBES: usize = 20;
/// Conditions of one kind at most.
pub const CONDITIONS: usize = 20;
/// Letters of a name at most.
pub const NAME_LETTERS: usize = 80;
/// Letters of a title at most.
pub const TITLE_LETTERS: usize = 200;
/// Letters of notes at most.
pub const NOTES_LETTERS: usize = 10_000;
