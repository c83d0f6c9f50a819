use super::*;
use crate::scale::numbers::ONE_TERM_ABOVE;
use approx::assert_relative_eq;

const BODIES: [Body; 3] = [Body::Slab, Body::Cylinder, Body::Sphere];

/// (Bi, [(zeta, C) of slab, cylinder, sphere]), mpmath with 30 digits, printed to eight.
#[rustfmt::skip]
const FIRST_TERMS: [(f64, [(f64, f64); 3]); 13] = [
    (0.01, [(0.099_833_639, 1.001_660_8), (0.141_244_76, 1.002_495_8), (0.173_031_99, 1.002_998_1)]),
    (0.02, [(0.140_951_68, 1.003_310_1), (0.199_501_04, 1.004_983_3), (0.244_459_71, 1.005_992_2)]),
    (0.05, [(0.221_760_39, 1.008_188_9), (0.314_261_65, 1.012_395_3), (0.385_368_1, 1.014_950_6)]),
    (0.1, [(0.311_052_85, 1.016_094_2), (0.441_681_78, 1.024_579_4), (0.542_280_89, 1.029_797_7)]),
    (0.2, [(0.432_840_72, 1.031_087_6), (0.616_974_77, 1.048_304_4), (0.759_307_69, 1.059_154_8)]),
    (0.5, [(0.653_271_19, 1.070_128_1), (0.940_770_56, 1.114_254_6), (1.165_561_2, 1.144_106_3)]),
    (1.0, [(0.860_333_59, 1.119_132), (1.255_783_7, 1.207_092_1), (FRAC_PI_2, 4.0 / PI)]),
    (2.0, [(1.076_874, 1.178_455_8), (1.599_449_2, 1.338_377_1), (2.028_757_8, 1.479_319)]),
    (5.0, [(1.313_837_7, 1.240_249_3), (1.989_814_7, 1.502_869_1), (2.570_431_6, 1.787_000_9)]),
    (10.0, [(1.428_87, 1.261_962_6), (2.179_496_6, 1.567_691_8), (2.836_300_4, 1.924_908_6)]),
    (20.0, [(1.496_129, 1.269_916), (2.288_048_5, 1.591_943_7), (2.985_724, 1.978_137_6)]),
    (50.0, [(1.540_005_9, 1.272_651_8), (2.357_242_1, 1.600_221_2), (3.078_841_6, 1.996_220_6)]),
    (100.0, [(1.555_245_1, 1.273_087_6), (2.380_901_7, 1.601_523_9), (3.110_187, 1.999_033_5)]),
];

#[test]
fn roots_and_coefficients_are_those_of_the_table() {
    for (biot, row) in FIRST_TERMS {
        for (body, (root, coefficient)) in BODIES.into_iter().zip(row) {
            let term = OneTerm::new(body, biot);
            // Half a unit of the last printed digit.
            assert_relative_eq!(term.root, root, max_relative = 6e-8);
            assert_relative_eq!(term.coefficient, coefficient, max_relative = 6e-8);
        }
    }
}

#[test]
fn a_held_face_is_the_limit_of_a_strong_film() {
    // Roots pi/2, first zero of J0, pi; coefficients 4/pi, 1.60197 (tables of Bessel functions), 2.
    let held = [(FRAC_PI_2, 4.0 / PI), (2.404_825_557_695_773, 1.601_974_7), (PI, 2.0)];
    for (body, (root, coefficient)) in BODIES.into_iter().zip(held) {
        let term = OneTerm::new(body, f64::INFINITY);
        assert_relative_eq!(term.root, root, max_relative = 1e-14);
        assert_relative_eq!(term.coefficient, coefficient, max_relative = 5e-8);
        assert!(term.at(1.0).abs() < 1e-14, "the face has the temperature of the surroundings");
        assert_relative_eq!(OneTerm::new(body, 1e14).root, root, max_relative = 1e-13);
    }
}

#[test]
fn a_very_weak_film_leaves_one_temperature_throughout() {
    for (body, area_over_volume) in BODIES.into_iter().zip([1.0, 2.0, 3.0]) {
        for biot in [1e-12, 0.9e-6, 1.1e-6, 1e-4] {
            let term = OneTerm::new(body, biot);
            // zeta² = n Bi up to a part of the size Bi.
            assert_relative_eq!(
                term.root * term.root,
                area_over_volume * biot,
                max_relative = 0.5 * biot + 1e-9
            );
            assert_relative_eq!(term.mean(), 1.0, max_relative = biot + 1e-9);
            assert_relative_eq!(term.at(0.0), 1.0, max_relative = biot + 1e-9);
        }
    }
}

#[test]
fn second_roots_solve_the_equation_and_lie_between_no_film_and_a_held_face() {
    // Bi = 1: slab 3.4256, cylinder 4.0795, sphere 4.7124 (Carslaw and Jaeger 1959, appendix IV).
    for (body, root) in BODIES.into_iter().zip([3.4256, 4.0795, 4.7124]) {
        assert_relative_eq!(OneTerm::second(body, 1.0).root, root, epsilon = 5e-5);
        assert!(OneTerm::second(body, 1e-9).root < OneTerm::second(body, f64::INFINITY).root);
    }
}

/// One material with a film at its outer face, everything else insulated.
struct Cooled {
    body: Body,
    length: f64,
    conductivity: f64,
    capacity: f64,
    film: f64,
    start: f64,
    surroundings: f64,
}

impl Cooled {
    fn term(&self) -> OneTerm {
        OneTerm::new(self.body, self.film * self.length / self.conductivity)
    }

    /// Fourier number at a time.
    fn fourier(&self, time: f64) -> f64 {
        self.conductivity / self.capacity * time / (self.length * self.length)
    }

    fn temperature(&self, amplitude: f64, time: f64) -> f64 {
        let remaining = self.term().remaining(amplitude, self.fourier(time));
        self.surroundings + (self.start - self.surroundings) * remaining
    }

    fn time(&self, amplitude: f64, limit: f64) -> f64 {
        let remaining = (limit - self.surroundings) / (self.start - self.surroundings);
        self.term().fourier(amplitude, remaining) / self.fourier(1.0)
    }
}

/// Holds centre, mean and face, each (limit °C, s by the full series), against the first term.
fn passes(body: &Cooled, centre: (f64, f64), mean: (f64, f64), face: (f64, f64)) {
    let term = body.term();
    let second = OneTerm::second(body.body, body.film * body.length / body.conductivity);
    let amplitudes = [(term.at(0.0), 0.0), (term.mean(), 0.0), (term.at(1.0), 1.0)];
    for ((amplitude, place), (limit, time)) in amplitudes.into_iter().zip([centre, mean, face]) {
        let found = body.time(amplitude, limit);
        let fourier = body.fourier(found);
        if body.fourier(time) < ONE_TERM_ABOVE {
            assert!(fourier < ONE_TERM_ABOVE, "{limit} °C: too early, and so it says: {found} s, {time} s");
            continue;
        }
        let difference = (found / time - 1.0).abs();
        // The second term and, to a tenth of it, all that follow; 1e-8 are the digits printed.
        let allowed = 1.1 * term.doubt(&second, place, fourier) + 1e-8;
        assert!(difference < allowed, "{limit} °C: {found} s, series {time} s, allowed {allowed}");
        assert!(allowed < 0.01, "{allowed}");
    }
}

// The cases A01 to A05: expected times from the full series, mpmath 30 digits, 60 terms and more
// (Carslaw and Jaeger 1959, sections 3.11, 7.7, 9.4).

#[test]
fn a_steel_plate_nearly_uniform_inside() {
    let plate = Cooled {
        body: Body::Slab,
        length: 0.05,
        conductivity: 45.0,
        capacity: 7850.0 * 480.0,
        film: 18.0,
        start: 650.0,
        surroundings: 20.0,
    };
    passes(&plate, (60.0, 29_082.369_9), (200.0, 13_199.690_6), (60.0, 28_977.354_8));
}

#[test]
fn a_cylinder_of_bitumen_in_moving_air() {
    let drum = Cooled {
        body: Body::Cylinder,
        length: 0.28,
        conductivity: 0.17,
        capacity: 2.0e6,
        film: 9.0,
        start: 160.0,
        surroundings: 15.0,
    };
    passes(&drum, (60.0, 297_179.203), (60.0, 166_998.467), (30.0, 72_933.888_9));
}

#[test]
fn a_ceramic_ball_in_a_stirred_bath() {
    let ball = Cooled {
        body: Body::Sphere,
        length: 0.04,
        conductivity: 2.0,
        capacity: 3600.0 * 900.0,
        film: 5000.0,
        start: 900.0,
        surroundings: 25.0,
    };
    passes(&ball, (60.0, 1048.1148), (500.0, 70.429_875_3), (60.0, 33.954_795_6));
}

#[test]
fn a_brick_lining_in_still_air() {
    let lining = Cooled {
        body: Body::Slab,
        length: 0.2,
        conductivity: 0.7,
        capacity: 1800.0 * 840.0,
        film: 12.0,
        start: 400.0,
        surroundings: 20.0,
    };
    passes(&lining, (60.0, 140_554.244), (60.0, 125_353.483), (45.0, 105_107.991));
}

#[test]
fn a_rubber_sheet_in_hot_water() {
    let sheet = Cooled {
        body: Body::Slab,
        length: 0.02,
        conductivity: 0.25,
        capacity: 1200.0 * 1500.0,
        film: 1250.0,
        start: 20.0,
        surroundings: 100.0,
    };
    passes(&sheet, (90.0, 2_763.431_64), (29.0, 33.655_943_6), (98.0, 146.389_617));
}

// Published worked examples, recomputed with the full series.

#[test]
fn a_pipe_wall_heated_by_oil() {
    // Incropera, example 5.4, taken as flat; recomputed 43.02 and 45.36 °C, printed to 0.01.
    let wall = Cooled {
        body: Body::Slab,
        length: 0.04,
        conductivity: 63.9,
        capacity: 7832.0 * 434.0,
        film: 500.0,
        start: -20.0,
        surroundings: 60.0,
    };
    let term = wall.term();
    assert_relative_eq!(wall.temperature(term.at(0.0), 480.0), 43.02, epsilon = 0.005);
    assert_relative_eq!(wall.temperature(term.at(1.0), 480.0), 45.36, epsilon = 0.005);
}

#[test]
fn an_egg_in_boiling_water() {
    // Cengel, example 4-3: 14.4 min; recomputed 14.358 min, printed to 0.001.
    let egg = Cooled {
        body: Body::Sphere,
        length: 0.025,
        conductivity: 0.627,
        capacity: 0.627 / 1.51e-7,
        film: 1200.0,
        start: 5.0,
        surroundings: 95.0,
    };
    // Fo 0.21 there: the second term still moves the time by 1.4e-3 of it.
    assert_relative_eq!(egg.time(egg.term().at(0.0), 70.0) / 60.0, 14.358, max_relative = 2e-3);
}

#[test]
fn a_long_steel_shaft() {
    // Cengel, example 4-5: 360 °C read off a chart; recomputed 364.3 °C, printed to 0.1.
    let shaft = Cooled {
        body: Body::Cylinder,
        length: 0.1,
        conductivity: 14.9,
        capacity: 14.9 / 3.95e-6,
        film: 80.0,
        start: 600.0,
        surroundings: 200.0,
    };
    assert_relative_eq!(shaft.temperature(shaft.term().at(0.0), 2700.0), 364.3, epsilon = 0.06);
}
