//! Emissivities of surfaces found on plant.

use super::{Choice, choice};

const TABLES: &str = "published tables of total emissivity (confirmed)";
const MEMORY: &str = "handbook figure (from memory)";

/// Emissivities of surfaces at plant temperatures.
pub const EMISSIVITY: &[Choice] = &[
    choice(
        "cladding, aluminium, bright",
        0.04,
        0.05,
        0.09,
        "published tables (confirmed); ISO 12241 (from \
                                                             memory)",
    ),
    choice(
        "cladding, aluminium, a little oxidised",
        0.10,
        0.13,
        0.31,
        "ISO 12241 (from memory); upper end published tables (confirmed)",
    ),
    choice("cladding, aluminium, dull", 0.20, 0.25, 0.31, "heavily oxidised, published tables (confirmed)"),
    choice(
        "cladding, aluminium, weathered heavily",
        0.20,
        0.40,
        0.90,
        "published tables, ends only \
                                                                        (confirmed)",
    ),
    choice(
        "cladding, galvanised, bright",
        0.07,
        0.25,
        0.28,
        "published tables (confirmed); ISO 12241 about 0.26 (from memory)",
    ),
    choice(
        "cladding, galvanised, dusty or weathered",
        0.28,
        0.44,
        0.85,
        "ISO 12241 (from memory); upper end published tables (confirmed)",
    ),
    choice("cladding, stainless, bright", 0.10, 0.17, 0.30, MEMORY),
    choice("cladding of plastic or cloth", 0.88, 0.94, 0.96, "ISO 12241, non-metallic (from memory)"),
    choice("stainless steel, oxidised in service", 0.40, 0.60, 0.85, MEMORY),
    choice("steel, bright, freshly ground or rolled", 0.15, 0.24, 0.35, TABLES),
    choice("steel, rolled sheet", 0.55, 0.60, 0.77, TABLES),
    choice("steel, with mill scale", 0.74, 0.80, 0.88, TABLES),
    choice("steel, rusty", 0.61, 0.69, 0.95, TABLES),
    choice("cast iron, as cast", 0.70, 0.81, 0.90, TABLES),
    choice("painted, any colour", 0.80, 0.92, 0.95, TABLES),
    choice("painted, aluminium paint", 0.40, 0.50, 0.60, TABLES),
    choice("copper, polished", 0.02, 0.03, 0.07, TABLES),
    choice("copper, oxidised", 0.57, 0.65, 0.88, TABLES),
    choice("brick, red", 0.88, 0.93, 0.95, MEMORY),
    choice("fireclay brick, hot", 0.59, 0.75, 0.85, MEMORY),
    choice("concrete", 0.88, 0.92, 0.97, TABLES),
    choice("glass", 0.88, 0.92, 0.97, TABLES),
    choice("enamel, glass lining", 0.85, 0.90, 0.95, MEMORY),
    choice("rubber or plastic", 0.90, 0.93, 0.95, MEMORY),
    choice("wood", 0.85, 0.90, 0.95, TABLES),
    choice("water, ice, frost", 0.95, 0.96, 0.98, MEMORY),
    choice("soot, carbon", 0.95, 0.96, 0.98, TABLES),
];
