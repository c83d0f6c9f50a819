//! Refractory bricks and castables.

use super::curve::Curve::{Lines, Same};
use super::{DATA_SHEETS, Entry, Phase, spread};

const HEAT_ATLAS: &str = "VDI Heat Atlas, 2nd ed. 2010, refractory tables from 400 °C up (confirmed). Heat \
                          capacity at 20 °C: 800 to 850 J/kgK (from memory)";
const HELD_BELOW: &str = "Below 400 °C the conductivity is held and the heat capacity is a straight line to \
                          825 J/kgK at 20 °C.";

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        id: "fireclay-brick",
        name: "Fireclay brick",
        phase: Phase::Solid,
        density: Same(2_150.0),
        heat_capacity: Lines(&[
            (20.0, 825.0),
            (400.0, 956.0),
            (600.0, 997.0),
            (800.0, 1021.0),
            (1000.0, 1037.0),
            (1200.0, 1054.0),
        ]),
        conductivity: Lines(&[(400.0, 1.05), (600.0, 1.1), (800.0, 1.15), (1000.0, 1.18), (1200.0, 1.22)]),
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1200.0),
        spread_percent: spread(5.0, 7.0, 15.0),
        source: HEAT_ATLAS,
        notes: HELD_BELOW,
    },
    Entry {
        id: "insul-brick-1260",
        name: "Insulating firebrick, class 1260",
        phase: Phase::Solid,
        density: Same(490.0),
        heat_capacity: Lines(&[
            (20.0, 825.0),
            (400.0, 942.0),
            (600.0, 979.0),
            (800.0, 1002.0),
            (1000.0, 1017.0),
            (1200.0, 1033.0),
        ]),
        conductivity: Lines(&[(400.0, 0.14), (600.0, 0.16), (800.0, 0.18), (1000.0, 0.2), (1200.0, 0.22)]),
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1200.0),
        spread_percent: spread(10.0, 7.0, 15.0),
        source: HEAT_ATLAS,
        notes: HELD_BELOW,
    },
    Entry {
        id: "castable-dense-60",
        name: "Dense castable, 60 % alumina",
        phase: Phase::Solid,
        density: Same(2_450.0),
        heat_capacity: Lines(&[(20.0, 830.0), (400.0, 970.0), (800.0, 1060.0), (1200.0, 1130.0)]),
        conductivity: Lines(&[(20.0, 1.5), (400.0, 1.5), (800.0, 1.6), (1200.0, 1.7)]),
        viscosity: None,
        expansion: None,
        range_c: (20.0, 1200.0),
        spread_percent: spread(5.0, 10.0, 25.0),
        source: DATA_SHEETS,
        notes: "Dry. The free water of a first heating is not counted.",
    },
];
