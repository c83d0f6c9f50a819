//! Heat capacity of carbon steel with its peak at 735 °C.

use super::super::Law;
use crate::units::kelvin;

/// Below the peak `666 + 13002 / (738 - T)`, above it `545 + 17820 / (T - 731)`, T in °C.
const BELOW: Branch = Branch { base: 666.0, strength: 13_002.0, pole: 738.0 };
const ABOVE: Branch = Branch { base: 545.0, strength: 17_820.0, pole: 731.0 };

/// Pieces per branch. The distance to the pole shrinks by the same factor over each; a cubic with the right
/// values and slopes at both ends of so many is right to 0.1 % everywhere and in its integral to 0.01 %.
const PIECES: i32 = 16;

/// J/(kg K) between 20 and 1200 °C.
///
/// # Source
/// EN 1993-1-2:2005, clause 3.4.1.2; its two rational branches stand here as cubics.
pub(super) fn heat_capacity() -> Law {
    let below = BELOW.knots(600.0, 735.0);
    let above = ABOVE.knots(735.0, 900.0);
    let cubic = [425.0, 0.773, -1.69e-3, 2.22e-6];
    let mut knots = vec![20.0];
    let mut pieces = vec![about(20.0, cubic)];
    for (branch, ends) in [(BELOW, &below), (ABOVE, &above)] {
        for pair in ends.windows(2) {
            knots.push(pair[0]);
            pieces.push(branch.cubic(pair[0], pair[1]));
        }
    }
    knots.push(900.0);
    pieces.push(vec![650.0]);
    knots.push(1_200.0);
    Law::pieces(knots.into_iter().map(kelvin).collect(), pieces)
}

/// `base + strength / |T - pole|`
#[derive(Clone, Copy)]
struct Branch {
    base: f64,
    strength: f64,
    pole: f64,
}

impl Branch {
    fn value(self, celsius: f64) -> f64 {
        self.base + self.strength / (celsius - self.pole).abs()
    }

    fn slope(self, celsius: f64) -> f64 {
        let distance = celsius - self.pole;
        -self.strength / (distance * distance.abs())
    }

    /// Ends of the pieces, °C.
    fn knots(self, from: f64, to: f64) -> Vec<f64> {
        let (first, last) = (from - self.pole, to - self.pole);
        let factor = |i: i32| libm::pow(last / first, f64::from(i) / f64::from(PIECES));
        let inner = (1..PIECES).map(|i| self.pole + first * factor(i));
        std::iter::once(from).chain(inner).chain([to]).collect()
    }

    /// The cubic in `T - from` with the branch's values and slopes at both ends.
    fn cubic(self, from: f64, to: f64) -> Vec<f64> {
        let width = to - from;
        let rise = (self.value(to) - self.value(from)) / width;
        let (left, right) = (self.slope(from), self.slope(to));
        vec![
            self.value(from),
            left,
            (3.0 * rise - 2.0 * left - right) / width,
            (left + right - 2.0 * rise) / (width * width),
        ]
    }
}

/// A cubic in T, written in `T - origin`.
fn about(origin: f64, [a, b, c, d]: [f64; 4]) -> Vec<f64> {
    vec![
        a + origin * (b + origin * (c + origin * d)),
        b + origin * (2.0 * c + origin * 3.0 * d),
        c + 3.0 * d * origin,
        d,
    ]
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn the_peak_holds_the_heat_that_the_standard_gives_it() {
        let law = heat_capacity();
        let held = |from: f64, to: f64| law.integral(kelvin(to)) - law.integral(kelvin(from));
        // Integrals of the printed branches by hand: base * width + strength * ln(ratio of distances).
        let below = 666.0 * 135.0 + 13_002.0 * libm::log(138.0 / 3.0);
        let above = 545.0 * 165.0 + 17_820.0 * libm::log(169.0 / 4.0);
        assert_relative_eq!(held(600.0, 735.0), below, max_relative = 1e-4);
        assert_relative_eq!(held(735.0, 900.0), above, max_relative = 1e-4);
        let cubic = |x: f64| x * (425.0 + x * (0.773 / 2.0 + x * (-1.69e-3 / 3.0 + x * 2.22e-6 / 4.0)));
        assert_relative_eq!(held(20.0, 600.0), cubic(600.0) - cubic(20.0), max_relative = 1e-12);
    }

    #[test]
    fn between_the_ends_of_its_pieces_it_follows_the_standard() {
        let law = heat_capacity();
        for i in 0..=3_000 {
            let celsius = 600.5 + f64::from(i) * 0.0995;
            let expected = if celsius < 735.0 { BELOW.value(celsius) } else { ABOVE.value(celsius) };
            assert_relative_eq!(law.value(kelvin(celsius)), expected, max_relative = 1e-3);
        }
        assert_relative_eq!(law.value(kelvin(735.0)), 5_000.0, max_relative = 1e-9);
    }
}
