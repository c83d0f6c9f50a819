//! Grains in bulk, with the air between them.

use super::curve::Curve::Same;
use super::{DATA_SHEETS, Entry, Phase, spread};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        id: "sand-dry",
        name: "Sand, dry",
        phase: Phase::Bed,
        density: Same(1_550.0),
        heat_capacity: Same(800.0),
        conductivity: Same(0.3),
        viscosity: None,
        expansion: None,
        range_c: (0.0, 400.0),
        spread_percent: spread(8.0, 5.0, 20.0),
        source: "Incropera and others, Fundamentals of Heat and Mass Transfer, Appendix A (from memory)",
        notes: "A little moisture doubles the conductivity or more.",
    },
    Entry {
        id: "wood-pellets",
        name: "Wood pellets in bulk",
        phase: Phase::Bed,
        density: Same(680.0),
        heat_capacity: Same(1_300.0),
        conductivity: Same(0.17),
        viscosity: None,
        expansion: None,
        range_c: (0.0, 100.0),
        spread_percent: spread(10.0, 15.0, 20.0),
        source: "W. Guo, PhD thesis, University of British Columbia 2013, and later papers on pellet beds \
                 (from memory; only the abstract was read)",
        notes: "Conductivity and heat capacity rise with moisture. Fresh pellets can heat themselves; that \
                is not counted.",
    },
    Entry {
        id: "polymer-pellets-pe",
        name: "Polyethylene pellets in bulk",
        phase: Phase::Bed,
        density: Same(570.0),
        heat_capacity: Same(2_100.0),
        conductivity: Same(0.16),
        viscosity: None,
        expansion: None,
        range_c: (0.0, 90.0),
        spread_percent: spread(8.0, 12.0, 25.0),
        source: DATA_SHEETS,
        notes: "",
    },
];
