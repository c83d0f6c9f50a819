//! The dimensionless numbers that say which formula holds.

/// Stefan-Boltzmann constant, W/(m² K⁴). Source: CODATA 2018, rounded.
pub const STEFAN_BOLTZMANN: f64 = 5.670_374_419e-8;

/// Below this Biot number (on volume over area) a body has nearly one temperature: the error of the
/// temperature is below 5 %. Source: Incropera et al. 2007, section 5.2.
pub const LUMPED_BELOW: f64 = 0.1;

/// Above this Fourier number one term of the series is enough: the error is below 2 %. Source: Heisler 1947.
pub const ONE_TERM_ABOVE: f64 = 0.2;

/// Below this Fourier number (on the thickness) the far side of a wall has not noticed: `erfc(1 / (2 √Fo))`
/// is 0.0016 there.
pub const THICK_BELOW: f64 = 0.05;

/// Volume over exchanging area, m: the length of the Biot number of a body with one temperature.
pub fn characteristic_length(volume: f64, area: f64) -> f64 {
    volume / area
}

/// How much harder heat passes through the body than away from its face; `film` W/(m² K), `length` m,
/// `conductivity` W/(m K).
pub fn biot(film: f64, length: f64, conductivity: f64) -> f64 {
    film * length / conductivity
}

/// Conductivity over heat capacity per volume, m²/s.
pub fn diffusivity(conductivity: f64, capacity: f64) -> f64 {
    conductivity / capacity
}

/// Time counted in the body's own diffusion time; `diffusivity` m²/s, `time` s, `length` m.
pub fn fourier(diffusivity: f64, time: f64, length: f64) -> f64 {
    diffusivity * time / (length * length)
}
