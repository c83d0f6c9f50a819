//! Plastics and wood.

use super::curve::Curve::Same;
use super::{Entry, ISO_10456, Phase, spread};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        id: "pp",
        name: "Polypropylene",
        phase: Phase::Solid,
        density: Same(910.0),
        heat_capacity: Same(1_800.0),
        conductivity: Same(0.22),
        viscosity: None,
        expansion: None,
        range_c: (-20.0, 120.0),
        spread_percent: spread(2.0, 12.0, 10.0),
        source: ISO_10456,
        notes: "Solid. It melts over 150 to 165 °C, about 95 kJ/kg, which is not in these curves. For a \
                melt that stays molten type about 750 kg/m³, 2700 J/kgK and 0.2 W/mK (all from memory).",
    },
    Entry {
        id: "pe-hd",
        name: "Polyethylene, high density",
        phase: Phase::Solid,
        density: Same(980.0),
        heat_capacity: Same(1_800.0),
        conductivity: Same(0.5),
        viscosity: None,
        expansion: None,
        range_c: (-50.0, 100.0),
        spread_percent: spread(3.0, 15.0, 12.0),
        source: ISO_10456,
        notes: "Solid. It melts over 120 to 137 °C, its crystalline part about 200 kJ/kg (from memory), \
                which is not in these curves; the heat capacity rises near melting.",
    },
    Entry {
        id: "ptfe",
        name: "PTFE",
        phase: Phase::Solid,
        density: Same(2_200.0),
        heat_capacity: Same(1_000.0),
        conductivity: Same(0.25),
        viscosity: None,
        expansion: None,
        range_c: (-50.0, 250.0),
        spread_percent: spread(3.0, 8.0, 8.0),
        source: ISO_10456,
        notes: "Changes its structure at 19 and 30 °C, about 13 kJ/kg together (from memory), not in these \
                curves.",
    },
    Entry {
        id: "timber-softwood",
        name: "Timber, softwood, across the grain",
        phase: Phase::Solid,
        density: Same(500.0),
        heat_capacity: Same(1_600.0),
        conductivity: Same(0.13),
        viscosity: None,
        expansion: None,
        range_c: (-20.0, 60.0),
        spread_percent: spread(10.0, 15.0, 20.0),
        source: ISO_10456,
        notes: "Dry.",
    },
];
