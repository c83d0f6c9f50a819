//! A wall so thick that its far side has not noticed (semi-infinite).
//!
//! Uniform start, constant properties, a step of the surroundings at time 0. Source: Carslaw and Jaeger 1959,
//! sections 2.4 (held face), 2.7 (film), 2.9 (given flux).

use super::numbers::diffusivity;
use super::roots::bisect;
use std::f64::consts::PI;

/// Above this argument `exp(z²) erfc(z)` is taken from its asymptotic series; six terms err by 1e-9 there.
const ASYMPTOTIC_ABOVE: f64 = 12.0;

/// Times looked through, as logarithms of the Fourier number on the depth.
const LOG_FOURIER: (f64, f64) = (-12.0, 60.0);

/// What happens at the face from time 0 on.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Step {
    /// The face has this temperature, K.
    Held(f64),
    /// A film, W/(m² K), to surroundings at a temperature, K.
    Film(f64, f64),
    /// Heat flux into the wall, W/m².
    Flux(f64),
}

/// The wall.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Wall {
    /// W/(m K)
    pub conductivity: f64,
    /// J/(m³ K)
    pub capacity: f64,
    /// K throughout at time 0.
    pub start: f64,
}

impl Wall {
    /// Temperature at a `depth` (m, 0 at the face) at a `time` (s, above 0), K.
    pub fn temperature(&self, step: Step, depth: f64, time: f64) -> f64 {
        let reach = 2.0 * (diffusivity(self.conductivity, self.capacity) * time).sqrt();
        let eta = depth / reach;
        match step {
            Step::Held(face) => self.start + (face - self.start) * libm::erfc(eta),
            Step::Film(film, surroundings) => {
                let beta = film * reach / (2.0 * self.conductivity);
                let behind = libm::exp(-eta * eta) * scaled_erfc(eta + beta);
                self.start + (surroundings - self.start) * (libm::erfc(eta) - behind)
            }
            Step::Flux(flux) => {
                let spread = libm::exp(-eta * eta) / PI.sqrt() - eta * libm::erfc(eta);
                self.start + flux * reach / self.conductivity * spread
            }
        }
    }

    /// The time at which `limit` (K) is passed at a `depth` (m), s; none where it never is.
    ///
    /// `length` m only gives the scale of the search, for a depth of 0.
    pub fn time(&self, step: Step, depth: f64, length: f64, limit: f64) -> Option<f64> {
        let rises = match step {
            Step::Held(to) | Step::Film(_, to) => to > self.start,
            Step::Flux(flux) => flux > 0.0,
        };
        let sign = if rises { 1.0 } else { -1.0 };
        let scale = if depth > 0.0 { depth } else { length };
        let unit = scale * scale / diffusivity(self.conductivity, self.capacity);
        let past = |log: f64| sign * (self.temperature(step, depth, unit * libm::exp(log)) - limit);
        let (early, late) = LOG_FOURIER;
        if past(early) >= 0.0 || past(late) < 0.0 {
            return None;
        }
        Some(unit * libm::exp(bisect(early, late, past)))
    }
}

/// `exp(z²) erfc(z)` for z of 0 and more.
fn scaled_erfc(z: f64) -> f64 {
    if z < ASYMPTOTIC_ABOVE {
        return libm::exp(z * z) * libm::erfc(z);
    }
    // 1 - 1/(2z²) + 3/(2z²)² - 15/(2z²)³ + ...; Abramowitz and Stegun 1964, 7.1.23.
    let x = 0.5 / (z * z);
    (1.0 - x * (1.0 - 3.0 * x * (1.0 - 5.0 * x * (1.0 - 7.0 * x * (1.0 - 9.0 * x))))) / (z * PI.sqrt())
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    const CONCRETE: Wall = Wall { conductivity: 1.4, capacity: 2300.0 * 880.0, start: 60.0 };

    fn time(start: f64, step: Step, depth: f64, limit: f64) -> f64 {
        Wall { start, ..CONCRETE }.time(step, depth, 2.0, limit).expect("it is passed")
    }

    // B03 to B05, closed forms with mpmath, printed to nine digits (Carslaw and Jaeger 1959, 2.4, 2.7, 2.9).

    #[test]
    fn a_foundation_whose_face_is_held_cold() {
        let found = time(60.0, Step::Held(5.0), 0.1, 40.0);
        assert_relative_eq!(found, 8_758.765_42, max_relative = 1e-8);
    }

    #[test]
    fn a_foundation_under_warm_air() {
        let found = time(5.0, Step::Film(15.0, 60.0), 0.05, 20.0);
        assert_relative_eq!(found, 7_555.721_45, max_relative = 1e-8);
    }

    #[test]
    fn concrete_under_a_radiant_panel() {
        assert_relative_eq!(time(18.0, Step::Flux(900.0), 0.03, 40.0), 4_015.620_56, max_relative = 1e-8);
        assert_relative_eq!(time(18.0, Step::Flux(900.0), 0.0, 60.0), 4_846.653_67, max_relative = 1e-8);
    }

    #[test]
    fn the_depth_at_which_pipes_do_not_freeze() {
        // Cengel, example 4-6: 0 °C after 90 days at 0.8009 m (recomputed, printed to 1e-4 m; the time goes
        // with the square of the depth).
        let ground = Wall { conductivity: 0.4, capacity: 0.4 / 1.5e-7, start: 15.0 };
        let found = ground.time(Step::Held(-10.0), 0.8009, 1.0, 0.0).expect("it freezes");
        assert_relative_eq!(found, 90.0 * 86_400.0, max_relative = 2e-4);
    }

    #[test]
    fn a_strong_film_is_a_held_face_at_every_depth() {
        let held = time(60.0, Step::Held(5.0), 0.1, 40.0);
        let film = time(60.0, Step::Film(1e9, 5.0), 0.1, 40.0);
        assert_relative_eq!(film, held, max_relative = 1e-6);
    }

    #[test]
    fn what_lies_beyond_the_surroundings_is_never_passed() {
        assert_eq!(CONCRETE.time(Step::Film(15.0, 5.0), 0.05, 2.0, 4.0), None);
        assert_eq!(CONCRETE.time(Step::Held(5.0), 0.1, 2.0, 61.0), None);
    }

    #[test]
    fn the_two_branches_of_the_scaled_function_meet() {
        let (below, above) = (scaled_erfc(ASYMPTOTIC_ABOVE * (1.0 - 1e-15)), scaled_erfc(ASYMPTOTIC_ABOVE));
        // exp(144) carries 144 units of rounding.
        assert_relative_eq!(below, above, max_relative = 1e-8);
    }
}
