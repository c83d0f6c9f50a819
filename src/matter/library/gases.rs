//! Gases at 1 atm.

use super::curve::Curve::{Lines, LogOverInverse, OverInverse};
use super::{Entry, Phase, spread};

pub(super) const ENTRIES: &[Entry] = &[Entry {
    id: "air",
    name: "Air, still",
    phase: Phase::Gas,
    density: OverInverse(&[
        (-40.0, 1.516),
        (0.0, 1.2931),
        (20.0, 1.2046),
        (50.0, 1.0925),
        (100.0, 0.94587),
        (200.0, 0.74581),
        (300.0, 0.61565),
        (500.0, 0.45639),
        (800.0, 0.32883),
    ]),
    heat_capacity: Lines(&[
        (-40.0, 1005.7),
        (0.0, 1005.7),
        (20.0, 1006.1),
        (50.0, 1007.4),
        (100.0, 1011.2),
        (200.0, 1025.0),
        (300.0, 1045.1),
        (500.0, 1092.4),
        (800.0, 1154.3),
    ]),
    conductivity: Lines(&[
        (-40.0, 0.021225),
        (0.0, 0.02436),
        (20.0, 0.025874),
        (50.0, 0.028083),
        (100.0, 0.03162),
        (200.0, 0.038249),
        (300.0, 0.044418),
        (500.0, 0.055795),
        (800.0, 0.071348),
    ]),
    viscosity: Some(LogOverInverse(&[
        (-40.0, 1.5152e-5),
        (0.0, 1.7218e-5),
        (20.0, 1.8206e-5),
        (50.0, 1.9635e-5),
        (100.0, 2.1896e-5),
        (200.0, 2.6046e-5),
        (300.0, 2.9811e-5),
        (500.0, 3.6531e-5),
        (800.0, 4.5317e-5),
    ])),
    // Ideal gas, 1/T: at 233.15 K and 1073.15 K.
    expansion: Some(OverInverse(&[(-40.0, 1.0 / 233.15), (800.0, 1.0 / 1073.15)])),
    range_c: (-40.0, 800.0),
    spread_percent: spread(0.5, 0.5, 2.0),
    source: "Reference equation of state at 1 atm, computed with CoolProp 8.0.0. Expansion: ideal gas, 1/T",
    notes: "Conduction alone. An air gap also radiates, and from about 10 mm on it moves: give it as a \
            contact resistance (\"air gap\") rather than as a layer of this.",
}];
