//! Contact resistances at the joint of two layers.

use super::{Choice, choice};

const GAP: &str = "ISO 6946, conduction or convection in the gap, with radiation between dull faces; likely \
                   at 20 °C, low at 100 °C, high between bright faces";

/// Contact resistances, m² K/W.
pub const CONTACT: &[Choice] = &[
    choice("fused or grown together: weld, enamel on steel", 0.0, 0.0, 1e-5, "common practice, no source"),
    choice("metal on metal with paste or solder", 1e-5, 3e-5, 1e-4, "common practice, no source"),
    choice(
        "metal pressed on metal, dry",
        5e-5,
        2e-4,
        5e-4,
        "heat-transfer texts, aluminium in air 2.75e-4 (from memory); range: common practice, no source",
    ),
    choice("thin scale or fouling", 1e-4, 3e-4, 1e-3, "common practice, no source"),
    choice(
        "mortar joint, 2 to 5 mm",
        0.002,
        0.003,
        0.006,
        "thickness over the conductivity of mortar, 0.8 \
                                                            to 1.2 W/mK",
    ),
    choice("bricks laid dry, loose joint", 0.006, 0.015, 0.036, "air gap of 0.2 to 1 mm, as below"),
    choice("insulation laid on a wall", 0.0, 0.005, 0.02, "common practice, no source"),
    choice("air gap, 1 mm", 0.024, 0.034, 0.040, GAP),
    choice("air gap, 5 mm", 0.063, 0.10, 0.19, GAP),
    choice(
        "air gap, 25 mm or more, upright",
        0.085,
        0.17,
        0.19,
        "ISO 6946, upright, with radiation between dull faces: high at 10 °C, likely at 20 °C, low at 100 \
         °C and 20 K across",
    ),
    choice(
        "air gap, 25 mm or more, upright, one face bright foil",
        0.40,
        0.55,
        0.70,
        "ISO 6946, upright, radiation at emissivity 0.05, 5 to 20 K across, near room temperature",
    ),
];
