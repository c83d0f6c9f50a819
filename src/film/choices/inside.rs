//! Film coefficients between moving contents and what holds them.

use super::{Choice, choice};

const AT_REST: &str = "Churchill and Chu 1975, wall 1 m high, 0.5 to 10 K between contents and wall";
const STIRRED: &str = "Chilton, Drew and Jebens 1944 with 0.36, vessel 1 m, stirrer 0.4 to 0.6 m at 0.7 to \
                       2 turns a second";

/// Film coefficients between contents and wall, W/(m² K): at rest (moved by their own buoyancy) and stirred.
pub const INSIDE_FILM: &[Choice] = &[
    choice("water or water-like, at rest", 200.0, 450.0, 900.0, AT_REST),
    choice("organic solvent, at rest", 80.0, 170.0, 280.0, AT_REST),
    choice("thin or hot oil (about as thin as milk), at rest", 40.0, 80.0, 150.0, AT_REST),
    choice(
        "thick oil (pours like honey or slower), at rest",
        10.0,
        25.0,
        50.0,
        "Churchill and Chu 1975, wall 1 m high, 2 to 10 K between contents and wall, 0.05 to 1 Pa s",
    ),
    choice(
        "air or gas, at rest (convection only)",
        1.3,
        2.5,
        4.5,
        "Churchill and Chu 1975, wall 1 m high, 1 to 40 K between contents and wall",
    ),
    choice("water or water-like, stirred", 800.0, 2_000.0, 4_500.0, STIRRED),
    choice("organic solvent, stirred", 300.0, 650.0, 1_200.0, STIRRED),
    choice("thin or hot oil, stirred", 120.0, 300.0, 550.0, STIRRED),
    choice(
        "thick oil, stirred",
        20.0,
        70.0,
        180.0,
        "Chilton, Drew and Jebens 1944 with 0.36, vessel 1 m, stirrer 0.4 to 0.6 m at 0.7 to 2 turns a \
         second, 0.05 to 1 Pa s",
    ),
];
