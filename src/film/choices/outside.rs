//! Film coefficients on the outside of an item.

use super::{Choice, choice};

const NATURAL: &str = "ISO 12241:2008, free convection: 1.74 dT^(1/3) on walls, 1.21 dT^(1/3) on pipes \
                       (read in a public implementation and from memory)";
const WIND: &str = "between a cylinder 1 m across after Churchill and Bernstein 1977 and 4 + 4 v of ISO \
                    6946 (from memory)";

/// Film coefficients towards surroundings, W/(m² K).
///
/// Without radiation, which the emissivity of the face adds, unless the words say that it is counted in: then
/// the emissivity is to be left out, or radiation counts twice.
pub const FILM: &[Choice] = &[
    choice("still air indoors (convection only)", 2.5, 4.5, 6.0, NATURAL),
    choice("still air, surface more than 100 K hotter (convection only)", 5.5, 8.0, 12.0, NATURAL),
    choice(
        "still air around a thin pipe or small part (convection only)",
        4.0,
        6.0,
        9.0,
        "ISO 12241:2008, free convection on a horizontal pipe: 1.25 (dT/D)^(1/4), D 20 to 100 mm, dT 10 to \
         60 K (read in a public implementation)",
    ),
    choice("draughty hall, about 1 m/s (convection only)", 5.0, 7.0, 10.0, "common practice, no source"),
    choice(
        "fan blowing on it, 3 to 5 m/s (convection only)",
        10.0,
        18.0,
        30.0,
        "cylinder 0.1 to 1 m across after Churchill and Bernstein 1977",
    ),
    choice("light wind, 2 m/s (convection only)", 6.0, 9.0, 12.0, WIND),
    choice("fresh wind, 5 m/s (convection only)", 13.0, 18.0, 24.0, WIND),
    choice("strong wind, 10 m/s (convection only)", 22.0, 32.0, 44.0, WIND),
    choice(
        "still air indoors, dull or painted surface, radiation counted in (leave the emissivity empty)",
        7.5,
        9.5,
        12.0,
        "ISO 6946 inside (1/0.13) up to a wall at 60 °C in a room at 20 °C after Churchill and Chu 1975 \
         with emissivity 0.9",
    ),
    choice(
        "still air indoors, bright metal jacket, radiation counted in (leave the emissivity empty)",
        3.0,
        5.0,
        8.0,
        "ISO 12241:2008, free convection, with radiation at emissivity 0.05 to 0.3",
    ),
    choice(
        "outdoors, some wind, radiation counted in (leave the emissivity empty)",
        15.0,
        25.0,
        35.0,
        "ISO 6946 outside, 1/0.04 at about 4 m/s (from memory); range: common practice, no source",
    ),
    choice(
        "water at rest",
        250.0,
        600.0,
        1_000.0,
        "Churchill and Chu 1975, wall 0.5 m high in water at 20 to 40 °C, 2 to 40 K apart",
    ),
    choice(
        "stirred water",
        800.0,
        2_000.0,
        4_000.0,
        "Chilton, Drew and Jebens 1944 with 0.36, vessel 1 m, stirrer 0.4 to 0.6 m at 0.7 to 2 turns a \
         second",
    ),
    choice(
        "running water in a jacket or pipe, 0.3 to 1.5 m/s",
        1_200.0,
        3_500.0,
        6_500.0,
        "Gnielinski 1976, 50 mm passage, water at 20 °C",
    ),
    choice("thermal oil in a jacket or coil", 200.0, 500.0, 1_000.0, "common practice, no source"),
    choice(
        "condensing steam, no air in it",
        4_500.0,
        8_000.0,
        15_000.0,
        "Nusselt 1916, film on a wall 0.5 to 2 m high; upper end from memory",
    ),
    choice("condensing steam with some air in it", 300.0, 1_000.0, 3_000.0, "common practice, no source"),
];
