//! One temperature throughout.
//!
//! Holds where the inside conducts far better than the face gives off: Biot number (volume over area) below
//! 0.1. Source: any heat-transfer text; Incropera et al. 2007, sections 5.1 to 5.3.

use super::numbers::STEFAN_BOLTZMANN;

/// Halves of Simpson's rule; the integrand is smooth over the logarithm of the distance, error below 1e-6.
const HALVES: u32 = 48;

/// Time in which a body comes from `start` to `limit`, s, when heat passes in proportion to the distance from
/// the temperature where it `settles`: `t = C R ln[(start - settles) / (limit - settles)]`.
///
/// `capacity` J/K, `resistance` K/W. `limit` lies between `start` and `settles`.
pub fn exponential_time(capacity: f64, resistance: f64, start: f64, limit: f64, settles: f64) -> f64 {
    capacity * resistance * libm::log((start - settles) / (limit - settles))
}

/// Time in which a body comes from `start` to `limit` by radiation alone, s; temperatures K.
///
/// `capacity` J/K, `area` m² (times emissivity). `limit` lies between `start` and `surroundings`.
/// Source: Incropera et al. 2007, equations 5.18 and 5.19 (towards 0 K).
pub fn radiation_time(capacity: f64, area: f64, start: f64, limit: f64, surroundings: f64) -> f64 {
    let per_kelvin = capacity / (area * STEFAN_BOLTZMANN);
    if surroundings <= 0.0 {
        let inverse_cube = |t: f64| 1.0 / (t * t * t);
        return per_kelvin / 3.0 * (inverse_cube(limit) - inverse_cube(start));
    }
    let course = |t: f64| {
        let nearness = ((surroundings + t) / (surroundings - t)).abs();
        libm::log(nearness) + 2.0 * libm::atan(t / surroundings)
    };
    let cube = surroundings * surroundings * surroundings;
    per_kelvin / (4.0 * cube) * (course(limit) - course(start))
}

/// Time in which a body comes from `start` to `limit`, s, for any flow of heat out of it: `t = - ∫ C dT / Q`.
///
/// `flow` W out of the body at a temperature K, passing zero where it `settles`. Simpson's rule over the
/// logarithm of the distance from there, over which the integrand is nearly constant.
pub fn flow_time(capacity: f64, flow: impl Fn(f64) -> f64, start: f64, limit: f64, settles: f64) -> f64 {
    let sign = if start > settles { 1.0 } else { -1.0 };
    let (from, to) = (libm::log((limit - settles).abs()), libm::log((start - settles).abs()));
    let at = |i: u32| {
        let distance = sign * libm::exp(from + (to - from) * f64::from(i) / f64::from(2 * HALVES));
        distance / flow(settles + distance)
    };
    let weight = |i: u32| match i {
        0 => 1.0,
        i if i == 2 * HALVES => 1.0,
        i if i % 2 == 1 => 4.0,
        _ => 2.0,
    };
    let sum: f64 = (0..=2 * HALVES).map(|i| weight(i) * at(i)).sum();
    capacity * (to - from) * sum / f64::from(6 * HALVES)
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    /// G01: a glowing plate in a cold vault; 811.517135 s by separation of variables.
    const GLOWING: (f64, f64, f64, f64, f64) = (4000.0, 0.5, 1100.0, 400.0, 293.15);

    #[test]
    fn a_glowing_plate_in_a_cold_vault() {
        let (capacity, area, start, limit, vault) = GLOWING;
        let time = radiation_time(capacity, area, start, limit, vault);
        assert_relative_eq!(time, 811.517_135, max_relative = 1e-8);
    }

    #[test]
    fn any_flow_gives_what_the_closed_forms_give() {
        let (capacity, area, start, limit, vault) = GLOWING;
        let fourth = |t: f64| t * t * t * t;
        let flow = |t: f64| area * STEFAN_BOLTZMANN * (fourth(t) - fourth(vault));
        let closed = radiation_time(capacity, area, start, limit, vault);
        assert_relative_eq!(flow_time(capacity, flow, start, limit, vault), closed, max_relative = 1e-6);
        // Warming in a furnace, to within 1 K of it.
        let flow = |t: f64| area * STEFAN_BOLTZMANN * (fourth(t) - fourth(1200.0));
        let closed = radiation_time(capacity, area, 300.0, 1199.0, 1200.0);
        assert_relative_eq!(flow_time(capacity, flow, 300.0, 1199.0, 1200.0), closed, max_relative = 1e-6);
        let flow = |t: f64| (t - 290.0) / 0.2;
        let closed = exponential_time(capacity, 0.2, 370.0, 310.0, 290.0);
        assert_relative_eq!(flow_time(capacity, flow, 370.0, 310.0, 290.0), closed, max_relative = 1e-12);
    }

    #[test]
    fn radiation_towards_nothing_is_the_limit_of_cold_surroundings() {
        let none = radiation_time(4000.0, 0.5, 1100.0, 400.0, 0.0);
        let cold = radiation_time(4000.0, 0.5, 1100.0, 400.0, 1.0);
        assert_relative_eq!(none, cold, max_relative = 1e-6);
    }

    #[test]
    fn a_film_alone_follows_newtons_law() {
        // One time constant later 1/e is left.
        let left = 290.0 + 80.0 * libm::exp(-1.0);
        assert_relative_eq!(exponential_time(5000.0, 0.2, 370.0, left, 290.0), 1000.0, max_relative = 1e-14);
    }
}
