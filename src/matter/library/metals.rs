//! Metals.

use super::curve::Curve::{Lines, Made, Polynomial, Same};
use super::{Entry, ISO_10456, Phase, carbon_steel, spread};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        id: "steel-carbon",
        name: "Carbon steel",
        phase: Phase::Solid,
        density: Same(7_850.0),
        heat_capacity: Made(carbon_steel::heat_capacity),
        // 54 - 0.0333 T until it meets 27.3.
        conductivity: Lines(&[(20.0, 53.334), (801.8, 27.3)]),
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1_200.0),
        spread_percent: spread(1.0, 8.0, 8.0),
        source: "EN 1993-1-2:2005, clauses 3.2.2 and 3.4.1 (confirmed)",
        notes: "Takes up much heat around 735 °C, where its structure changes. Low-alloy steels conduct 20 \
                to 30 % less at room temperature.",
    },
    Entry {
        id: "ss-304",
        name: "Stainless steel 304 (1.4301)",
        phase: Phase::Solid,
        density: Same(7_900.0),
        heat_capacity: AUSTENITIC_HEAT,
        conductivity: AUSTENITIC_CONDUCTIVITY,
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1_200.0),
        spread_percent: spread(2.0, 5.0, 8.0),
        source: AUSTENITIC_SOURCE,
        notes: "",
    },
    Entry {
        id: "ss-316",
        name: "Stainless steel 316L (1.4404)",
        phase: Phase::Solid,
        density: Same(8_000.0),
        heat_capacity: AUSTENITIC_HEAT,
        conductivity: AUSTENITIC_CONDUCTIVITY,
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1_200.0),
        spread_percent: spread(2.0, 5.0, 8.0),
        source: AUSTENITIC_SOURCE,
        notes: "",
    },
    Entry {
        id: "cast-iron",
        name: "Cast iron, grey",
        phase: Phase::Solid,
        density: Same(7_500.0),
        heat_capacity: Same(450.0),
        conductivity: Same(50.0),
        viscosity: None,
        expansion: None,
        range_c: (-20.0, 300.0),
        spread_percent: spread(3.0, 10.0, 20.0),
        source: ISO_10456,
        notes: "",
    },
    Entry {
        id: "aluminium-alloy",
        name: "Aluminium alloy",
        phase: Phase::Solid,
        density: Same(2_800.0),
        heat_capacity: Same(880.0),
        conductivity: Same(160.0),
        viscosity: None,
        expansion: None,
        range_c: (-20.0, 100.0),
        spread_percent: spread(3.0, 5.0, 20.0),
        source: ISO_10456,
        notes: "Alloys differ: 3xxx and 6xxx conduct more, about 190 W/mK (from memory).",
    },
    Entry {
        id: "copper",
        name: "Copper",
        phase: Phase::Solid,
        density: Same(8_900.0),
        heat_capacity: Same(380.0),
        conductivity: Same(380.0),
        viscosity: None,
        expansion: None,
        range_c: (-40.0, 200.0),
        spread_percent: spread(1.0, 3.0, 5.0),
        source: ISO_10456,
        notes: "",
    },
];

const AUSTENITIC_HEAT: super::Curve =
    Polynomial { in_celsius: &[450.0, 0.28, -2.91e-4, 1.34e-7], from: 20.0, to: 1_200.0 };
const AUSTENITIC_CONDUCTIVITY: super::Curve = Lines(&[(20.0, 14.854), (1_200.0, 29.84)]);
const AUSTENITIC_SOURCE: &str = "Conductivity and heat capacity: EN 1993-1-2:2005, Annex C (confirmed). \
                                 Density: Incropera and others, Fundamentals of Heat and Mass Transfer, \
                                 Appendix A (from memory)";
