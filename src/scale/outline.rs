//! Areas, volumes and resistances of one layer between two radii (slab: places).

use crate::item::Shape;
use std::f64::consts::PI;

/// A layer thinner than this part of its radius is flat: the exact means lose their digits there.
const FLAT: f64 = 1e-4;

/// Area at a radius, m².
pub fn area(shape: Shape, radius: f64) -> f64 {
    match shape {
        Shape::Slab => 1.0,
        Shape::Cylinder { .. } => 2.0 * PI * radius,
        Shape::Sphere { .. } => 4.0 * PI * radius * radius,
    }
}

/// Volume between two radii, m³.
pub fn volume(shape: Shape, from: f64, to: f64) -> f64 {
    let thickness = to - from;
    match shape {
        Shape::Slab => thickness,
        Shape::Cylinder { .. } => PI * (to + from) * thickness,
        Shape::Sphere { .. } => 4.0 / 3.0 * PI * (to * to + to * from + from * from) * thickness,
    }
}

/// Resistance between two radii, K/W; 0 from an axis or centre, which no heat crosses.
///
/// Source: any heat-transfer text; Carslaw and Jaeger 1959, sections 7.2 and 9.2.
pub fn resistance(shape: Shape, from: f64, to: f64, conductivity: f64) -> f64 {
    match shape {
        Shape::Slab => (to - from) / conductivity,
        Shape::Cylinder { .. } | Shape::Sphere { .. } if from <= 0.0 => 0.0,
        Shape::Cylinder { .. } => libm::log1p((to - from) / from) / (2.0 * PI * conductivity),
        Shape::Sphere { .. } => (to - from) / (4.0 * PI * conductivity * from * to),
    }
}

/// Part of the steady temperature difference across a layer that lies between its inner side and `at`.
pub fn fraction(shape: Shape, from: f64, to: f64, at: f64) -> f64 {
    match shape {
        Shape::Slab => (at - from) / (to - from),
        Shape::Cylinder { .. } | Shape::Sphere { .. } if from <= 0.0 => at / to,
        Shape::Cylinder { .. } => libm::log1p((at - from) / from) / libm::log1p((to - from) / from),
        Shape::Sphere { .. } => (at - from) * to / ((to - from) * at),
    }
}

/// The volume mean of [`fraction`] over a layer.
pub fn mean_fraction(shape: Shape, from: f64, to: f64) -> f64 {
    if (to - from) < FLAT * from || from <= 0.0 {
        return 0.5;
    }
    match shape {
        Shape::Slab => 0.5,
        Shape::Cylinder { .. } => {
            to * to / ((to + from) * (to - from)) - 0.5 / libm::log1p((to - from) / from)
        }
        Shape::Sphere { .. } => {
            let squares = to * to + to * from + from * from;
            let drop = (to - from) / (from * to);
            (1.0 / from - 1.5 * (to + from) / squares) / drop
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    const SHAPES: [Shape; 3] =
        [Shape::Slab, Shape::Cylinder { inner_radius: 0.3 }, Shape::Sphere { inner_radius: 0.3 }];

    #[test]
    fn a_mean_is_the_sum_over_thin_shells() {
        for shape in SHAPES {
            let shells = 2000;
            let (mut sum, mut whole) = (0.0, 0.0);
            for i in 0..shells {
                let at = |i: i32| 0.3 + 0.5 * f64::from(i) / f64::from(shells);
                let shell = volume(shape, at(i), at(i + 1));
                sum += shell * fraction(shape, 0.3, 0.8, 0.5 * (at(i) + at(i + 1)));
                whole += shell;
            }
            assert_relative_eq!(whole, volume(shape, 0.3, 0.8), max_relative = 1e-12);
            // Midpoint rule over 2000 shells: error of the size 1 / 2000².
            assert_relative_eq!(mean_fraction(shape, 0.3, 0.8), sum / whole, max_relative = 1e-6);
        }
    }

    #[test]
    fn a_thin_curved_layer_is_a_flat_one() {
        for shape in SHAPES {
            let flat = 1e-5 / (2.0 * area(shape, 0.3));
            assert_relative_eq!(resistance(shape, 0.3, 0.300_01, 2.0), flat, max_relative = 1e-4);
            assert_relative_eq!(mean_fraction(shape, 0.3, 0.300_04), 0.5, max_relative = 1e-4);
        }
    }

    #[test]
    fn resistances_add_up() {
        for shape in SHAPES {
            let parts = resistance(shape, 0.3, 0.5, 0.7) + resistance(shape, 0.5, 0.8, 0.7);
            assert_relative_eq!(resistance(shape, 0.3, 0.8, 0.7), parts, max_relative = 1e-14);
            let part = resistance(shape, 0.3, 0.5, 0.7) / parts;
            assert_relative_eq!(fraction(shape, 0.3, 0.8, 0.5), part, max_relative = 1e-13);
        }
    }
}
