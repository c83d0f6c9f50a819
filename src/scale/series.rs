//! The first term of the series for a slab, cylinder or sphere with a film at its face.
//!
//! `(T - T∞) / (T0 - T∞) = C exp(-zeta² Fo) X(zeta xi)`, with `xi` from the insulated face, axis or centre (0)
//! to the face (1) and Fo, Bi on that same length. Uniform start, constant properties, constant surroundings.
//! Source: Carslaw and Jaeger 1959, sections 3.11 (slab), 7.7 (cylinder), 9.4 (sphere); charts: Heisler 1947.

use super::roots::bisect;
use std::f64::consts::{FRAC_PI_2, PI};

/// Below this Biot number the root is taken from the first two terms of its power series; their error is
/// of the size Bi².
const TINY_BIOT: f64 = 1e-6;

/// Below this argument differences of nearly equal functions are taken from their power series.
const SMALL_ARGUMENT: f64 = 0.05;

/// Which series.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Body {
    /// Insulated at one face; or the half of one with two equal faces.
    Slab,
    /// Solid, around its axis.
    Cylinder,
    /// Solid, around its centre.
    Sphere,
}

/// The first term of the series.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct OneTerm {
    /// Which series.
    pub body: Body,
    /// First root `zeta`.
    pub root: f64,
    /// Coefficient `C`: the first term at the centre at Fo = 0.
    pub coefficient: f64,
}

impl OneTerm {
    /// The first term for a Biot number above 0; infinite for a held face.
    pub fn new(body: Body, biot: f64) -> Self {
        let root = first_root(body, biot);
        Self { body, root, coefficient: coefficient(body, root) }
    }

    /// The second term, likewise.
    pub fn second(body: Body, biot: f64) -> Self {
        let root = second_root(body, biot);
        Self { body, root, coefficient: coefficient(body, root) }
    }

    /// First term at Fo = 0 at the place `xi`.
    pub fn at(&self, xi: f64) -> f64 {
        self.coefficient * profile(self.body, self.root * xi)
    }

    /// First term at Fo = 0, volume mean.
    pub fn mean(&self) -> f64 {
        self.coefficient * mean(self.body, self.root)
    }

    /// `(T - T∞) / (T0 - T∞)` of something that begins at `amplitude`.
    pub fn remaining(&self, amplitude: f64, fourier: f64) -> f64 {
        amplitude * libm::exp(-self.root * self.root * fourier)
    }

    /// The Fourier number at which what begins at `amplitude` has come down to `remaining`.
    pub fn fourier(&self, amplitude: f64, remaining: f64) -> f64 {
        libm::log(amplitude / remaining) / (self.root * self.root)
    }

    /// How far the time found is off for want of the `second` term, as a part of it, at a place.
    pub fn doubt(&self, second: &Self, xi: f64, fourier: f64) -> f64 {
        let left = |term: &Self| term.remaining(term.at(xi), fourier).abs();
        let decay = self.root * self.root * fourier;
        if decay <= 0.0 { 1.0 } else { left(second) / left(self) / decay }
    }
}

/// First root of `zeta tan zeta = Bi`, `zeta J1/J0 = Bi`, `1 - zeta cot zeta = Bi`.
fn first_root(body: Body, biot: f64) -> f64 {
    if biot < TINY_BIOT {
        return match body {
            Body::Slab => (biot * (1.0 - biot / 3.0)).sqrt(),
            Body::Cylinder => (2.0 * biot * (1.0 - biot / 4.0)).sqrt(),
            Body::Sphere => (3.0 * biot * (1.0 - biot / 5.0)).sqrt(),
        };
    }
    match body {
        Body::Slab => bisect(0.0, FRAC_PI_2, |z| balance(body, biot, z)),
        // The first zero of J0 lies at 2.4048.
        Body::Cylinder => bisect(0.0, 2.5, |z| balance(body, biot, z)),
        Body::Sphere => bisect(0.0, PI, |z| balance(body, biot, z)),
    }
}

/// Second root of the same equations: between those for no film and for a held face.
fn second_root(body: Body, biot: f64) -> f64 {
    let (low, high) = match body {
        Body::Slab => (PI, 1.5 * PI),
        // Second zero of J1 and of J0. Source: Abramowitz and Stegun 1964, table 9.5.
        Body::Cylinder => (3.831_705_970_2, 5.520_078_110_3),
        // Second root of tan z = z. Source: Carslaw and Jaeger 1959, appendix IV.
        Body::Sphere => (4.493_409_457_9, 2.0 * PI),
    };
    bisect(low, high, |z| -balance(body, biot, z))
}

/// The equation for the roots, divided by 1 + Bi, so that a held face is no special case.
fn balance(body: Body, biot: f64, z: f64) -> f64 {
    let inside = 1.0 / (1.0 + biot);
    let outside = 1.0 - inside;
    match body {
        Body::Slab => inside * z * libm::sin(z) - outside * libm::cos(z),
        Body::Cylinder => inside * z * libm::j1(z) - outside * libm::j0(z),
        Body::Sphere => inside * sine_less(z) - outside * libm::sin(z),
    }
}

fn coefficient(body: Body, z: f64) -> f64 {
    match body {
        Body::Slab => 4.0 * libm::sin(z) / (2.0 * z + libm::sin(2.0 * z)),
        Body::Cylinder => {
            let (j0, j1) = (libm::j0(z), libm::j1(z));
            2.0 * j1 / (z * (j0 * j0 + j1 * j1))
        }
        Body::Sphere => 4.0 * sine_less(z) / twice_less_sine(z),
    }
}

fn profile(body: Body, x: f64) -> f64 {
    match body {
        Body::Slab => libm::cos(x),
        Body::Cylinder => libm::j0(x),
        Body::Sphere if x < 1e-8 => 1.0,
        Body::Sphere => libm::sin(x) / x,
    }
}

fn mean(body: Body, z: f64) -> f64 {
    match body {
        Body::Slab => libm::sin(z) / z,
        Body::Cylinder => 2.0 * libm::j1(z) / z,
        Body::Sphere => 3.0 * sine_less(z) / (z * z * z),
    }
}

/// `sin z - z cos z`
fn sine_less(z: f64) -> f64 {
    if z > SMALL_ARGUMENT {
        return libm::sin(z) - z * libm::cos(z);
    }
    let square = z * z;
    z * square * (1.0 / 3.0 - square * (1.0 / 30.0 - square * (1.0 / 840.0 - square / 45_360.0)))
}

/// `2 z - sin 2 z`
fn twice_less_sine(z: f64) -> f64 {
    if z > SMALL_ARGUMENT {
        return 2.0 * z - libm::sin(2.0 * z);
    }
    let square = 4.0 * z * z;
    2.0 * z * square * (1.0 / 6.0 - square * (1.0 / 120.0 - square * (1.0 / 5040.0 - square / 362_880.0)))
}

#[cfg(test)]
mod tests;
