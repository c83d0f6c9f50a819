//! What the faces see at a moment, and the heat that comes in through them.

use crate::item::{Face, Item, Programme, Side};

/// Stefan-Boltzmann constant, W/(m² K⁴). Source: CODATA 2018, exact since the SI of 2019, rounded.
pub const STEFAN_BOLTZMANN: f64 = 5.670_374_419e-8;

/// What a face sees at one moment, with its change per second.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum FaceNow {
    /// No heat passes.
    Closed,
    /// The face has this temperature, K, and this slope, K/s.
    Held {
        /// K
        temperature: f64,
        /// K/s
        slope: f64,
    },
    /// Heat flux into the item, W/m², and its slope.
    Flux {
        /// W/m²
        flux: f64,
        /// W/(m² s)
        slope: f64,
    },
    /// Film and radiation.
    Exchange {
        /// W/(m² K)
        film: f64,
        /// K
        temperature: f64,
        /// K/s
        slope: f64,
        /// emissivity x Stefan-Boltzmann constant, W/(m² K⁴)
        radiation: f64,
        /// Fourth power of the temperature radiated to, K⁴, and its slope, K⁴/s.
        to_fourth: (f64, f64),
    },
}

/// Heat into the item through a face, with its derivatives.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct HeatIn {
    /// W
    pub heat: f64,
    /// How much less comes in for each K of the face, W/K.
    pub less_per_kelvin: f64,
    /// Its change per second at a face temperature that stays, W/s.
    pub per_second: f64,
}

impl FaceNow {
    /// What `face` sees at time `t`; slopes are taken just after it, so that a corner belongs to what follows.
    pub fn at(face: &Face, t: f64) -> Self {
        let after = t + 1e-9 * t.max(1.0);
        match face {
            Face::Insulated => Self::Closed,
            Face::Held(over_time) => {
                Self::Held { temperature: over_time.at(t).0, slope: over_time.at(after).1 }
            }
            Face::HeatFlux(over_time) => Self::Flux { flux: over_time.at(t).0, slope: over_time.at(after).1 },
            Face::Exchange { film, temperature, emissivity, radiation_to } => {
                let to = if *emissivity == 0.0 { 0.0 } else { radiation_to.at(t).0 };
                let to_slope = if *emissivity == 0.0 { 0.0 } else { radiation_to.at(after).1 };
                let cube = to * to * to;
                Self::Exchange {
                    film: *film,
                    temperature: temperature.at(t).0,
                    slope: temperature.at(after).1,
                    radiation: emissivity * STEFAN_BOLTZMANN,
                    to_fourth: (cube * to, 4.0 * cube * to_slope),
                }
            }
        }
    }

    /// Heat into the item at a face temperature. A held face is not asked: its heat is what its links carry.
    #[inline]
    pub fn heat_in(&self, face_temperature: f64, area: f64) -> HeatIn {
        match *self {
            Self::Closed | Self::Held { .. } => HeatIn::default(),
            Self::Flux { flux, slope } => {
                HeatIn { heat: area * flux, less_per_kelvin: 0.0, per_second: area * slope }
            }
            Self::Exchange { film, temperature, slope, radiation, to_fourth } => {
                let cube = face_temperature * face_temperature * face_temperature;
                HeatIn {
                    heat: area
                        * (film * (temperature - face_temperature)
                            + radiation * (to_fourth.0 - cube * face_temperature)),
                    less_per_kelvin: area * (film + 4.0 * radiation * cube),
                    per_second: area * (film * slope + radiation * to_fourth.1),
                }
            }
        }
    }
}

/// The rows that hold at time `t`, inner and outer.
pub fn faces_at(item: &Item, t: f64) -> [&Face; 2] {
    let row = |programme: &'_ Programme| programme.rows.partition_point(|row| row.0 <= t).max(1) - 1;
    let (inner, outer) = (item.face(Side::Inner), item.face(Side::Outer));
    [&inner.rows[row(inner)].1, &outer.rows[row(outer)].1]
}
