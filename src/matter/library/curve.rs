//! A property as a source prints it, over °C, and the law over K that it becomes.

use super::super::Law;
use crate::units::kelvin;

/// Longest straight stretch that stands for a curved one, K: a property that falls by 7 % per K, as the
/// viscosity of a cold oil does, is then right to 1.5 %.
const STRETCH: f64 = 5.0;

/// A property as its source prints it.
pub(super) enum Curve {
    /// The same at every temperature.
    Same(f64),
    /// Straight lines between points (°C, value), ascending.
    Lines(&'static [(f64, f64)]),
    /// `a0 + a1 T + a2 T² + ...` with T in °C, between two temperatures in °C.
    Polynomial { in_celsius: &'static [f64], from: f64, to: f64 },
    /// Points (°C, value) joined by lines straight over 1/T, as densities of gases are.
    OverInverse(&'static [(f64, f64)]),
    /// Points (°C, value) whose logarithm is straight over 1/T between them, as viscosities nearly are
    /// (Andrade 1930).
    LogOverInverse(&'static [(f64, f64)]),
    /// Volume expansion from density points (°C, kg/m³): `-(d rho / d T) / rho`, the slope that of the parabola
    /// through a point and its neighbours, at the ends that of the last stretch.
    ExpansionOf(&'static [(f64, f64)]),
    /// Made by a function of its own.
    Made(fn() -> Law),
}

impl Curve {
    /// The law over K.
    pub(super) fn law(&self) -> Law {
        match self {
            Self::Same(value) => Law::Constant(*value),
            Self::Lines(points) => Law::table(&in_kelvin(points)),
            Self::Polynomial { in_celsius, from, to } => {
                Law::polynomial_about(kelvin(0.0), kelvin(*from), kelvin(*to), in_celsius)
            }
            Self::OverInverse(points) => Law::table(&dense(points, |value| value, |value| value)),
            Self::LogOverInverse(points) => Law::table(&dense(points, libm::log, libm::exp)),
            Self::ExpansionOf(points) => Law::table(&expansion(&in_kelvin(points))),
            Self::Made(make) => make(),
        }
    }
}

fn in_kelvin(points: &[(f64, f64)]) -> Vec<(f64, f64)> {
    points.iter().map(|&(celsius, value)| (kelvin(celsius), value)).collect()
}

/// Points close together on curves that are straight in `there(value)` over 1/T.
fn dense(points: &[(f64, f64)], there: fn(f64) -> f64, back: fn(f64) -> f64) -> Vec<(f64, f64)> {
    let points = in_kelvin(points);
    let mut out = Vec::new();
    for pair in points.windows(2) {
        let ((t0, v0), (t1, v1)) = (pair[0], pair[1]);
        out.push((t0, v0));
        let stretches = ((t1 - t0) / STRETCH).ceil();
        let mut i = 1.0;
        while i < stretches {
            let t = t0 + (t1 - t0) * i / stretches;
            let share = (1.0 / t0 - 1.0 / t) / (1.0 / t0 - 1.0 / t1);
            out.push((t, back(there(v0) + (there(v1) - there(v0)) * share)));
            i += 1.0;
        }
    }
    out.extend(points.last());
    out
}

fn expansion(density: &[(f64, f64)]) -> Vec<(f64, f64)> {
    let stretches: Vec<(f64, f64)> = density
        .windows(2)
        .map(|pair| (pair[1].0 - pair[0].0, (pair[1].1 - pair[0].1) / (pair[1].0 - pair[0].0)))
        .collect();
    let slope = |i: usize| {
        let (left, right) = (stretches[i.saturating_sub(1)], stretches[i.min(stretches.len() - 1)]);
        if i == 0 || i == stretches.len() {
            return if i == 0 { right.1 } else { left.1 };
        }
        (left.1 * right.0 + right.1 * left.0) / (left.0 + right.0)
    };
    density.iter().enumerate().map(|(i, &(t, rho))| (t, -slope(i) / rho)).collect()
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn a_polynomial_keeps_its_values_in_celsius() {
        let law = Curve::Polynomial { in_celsius: &[450.0, 0.28, -2.91e-4, 1.34e-7], from: 20.0, to: 1200.0 };
        let at_500 = 450.0 + 140.0 - 72.75 + 16.75;
        assert_relative_eq!(law.law().value(kelvin(500.0)), at_500, max_relative = 1e-13);
    }

    #[test]
    fn an_ideal_gas_expands_by_one_over_its_temperature() {
        let law = Curve::OverInverse(&[(-40.0, 1.0 / 233.15), (800.0, 1.0 / 1073.15)]).law();
        for celsius in [-40.0, 3.0, 20.0, 333.0, 800.0] {
            // 5 K straight at 233 K: (5/233)²/4.
            assert_relative_eq!(law.value(kelvin(celsius)), 1.0 / kelvin(celsius), max_relative = 1.2e-4);
        }
    }

    #[test]
    fn a_viscosity_between_points_follows_its_logarithm() {
        let law = Curve::LogOverInverse(&[(20.0, 0.05136), (100.0, 0.0029)]).law();
        let share = (1.0 / 293.15 - 1.0 / 333.15) / (1.0 / 293.15 - 1.0 / 373.15);
        let expected = 0.05136 * libm::exp(share * libm::log(0.0029 / 0.05136));
        assert_relative_eq!(law.value(kelvin(60.0)), expected, max_relative = 5e-3);
    }

    #[test]
    fn expansion_from_density_is_that_of_a_parabola() {
        let rho = |x: f64| 1000.0 - 0.2 * x - 0.004 * x * x;
        let points: Vec<(f64, f64)> = [0.0, 10.0, 30.0, 40.0].iter().map(|&x| (x, rho(x))).collect();
        let expanded = expansion(&points);
        assert_relative_eq!(expanded[1].1, (0.2 + 0.008 * 10.0) / rho(10.0), max_relative = 1e-12);
        assert_relative_eq!(expanded[2].1, (0.2 + 0.008 * 30.0) / rho(30.0), max_relative = 1e-12);
        assert_relative_eq!(expanded[0].1, (0.2 + 0.004 * 10.0) / rho(0.0), max_relative = 1e-12);
    }
}
