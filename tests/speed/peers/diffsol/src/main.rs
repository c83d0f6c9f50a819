//! Peer of the speed comparison: BDF, ESDIRK 3(4) and TR-BDF2 of diffsol on a given system.
//!
//! Standard input, five lines per system, all numbers SI and kelvin:
//!
//! ```text
//! name target
//! heat capacity of each node
//! conductance of each link
//! film times area, emissivity times sigma times area, surroundings, start
//! (empty)
//! ```
//!
//! Standard output, one line per system, method and tolerance:
//! `name nodes method tolerance time steps milliseconds`. The only argument is the number of repetitions.

use diffsol::{
    FaerLU, FaerMat, FaerSparseLU, FaerSparseMat, OdeBuilder, OdeSolverMethod, OdeSolverStopReason,
};
use std::io::Read;

/// Tolerances tried, K; the relative one is a thousandth of it per kelvin.
const TOLERANCES: [f64; 7] = [1.0, 0.3, 0.1, 0.03, 1e-2, 1e-3, 1e-4];
/// More steps than any of the runs needs.
const MOST_STEPS: usize = 100_000;
/// Runs in one measurement: one alone is shorter than the clock is sure of.
const RUNS: usize = 10;

unsafe extern "C" {
    fn clock_gettime(id: i32, time: *mut [i64; 2]) -> i32;
}

/// Processor time of this process, s (Linux: clock 2).
fn processor_seconds() -> f64 {
    let mut time = [0_i64; 2];
    unsafe { clock_gettime(2, &raw mut time) };
    time[0] as f64 + time[1] as f64 * 1e-9
}

/// Nodes in a row: insulated inside, film and radiation outside.
struct System {
    name: String,
    /// K, of the first node, from above.
    target: f64,
    /// J/K per node
    capacity: Vec<f64>,
    /// W/K per link
    link: Vec<f64>,
    /// W/K
    film: f64,
    /// W/K⁴
    radiation: f64,
    /// K
    surroundings: f64,
    /// K
    start: f64,
}

impl System {
    /// Rate of change of each temperature, K/s.
    fn rate(&self, t: &[f64], rate: &mut [f64]) {
        let n = t.len();
        let mut from_inside = 0.0;
        for i in 0..n {
            let outwards = if i + 1 < n {
                self.link[i] * (t[i] - t[i + 1])
            } else {
                let (a, b) = (t[i] * t[i], self.surroundings * self.surroundings);
                self.film * (t[i] - self.surroundings) + self.radiation * (a * a - b * b)
            };
            rate[i] = (from_inside - outwards) / self.capacity[i];
            from_inside = outwards;
        }
    }

    /// Derivative of the rate times a direction.
    fn derivative(&self, t: &[f64], v: &[f64], out: &mut [f64]) {
        let n = t.len();
        let mut from_inside = 0.0;
        for i in 0..n {
            let outwards = if i + 1 < n {
                self.link[i] * (v[i] - v[i + 1])
            } else {
                (self.film + 4.0 * self.radiation * t[i] * t[i] * t[i]) * v[i]
            };
            out[i] = (from_inside - outwards) / self.capacity[i];
            from_inside = outwards;
        }
    }
}

/// One march to the asked time: (s, steps); NaN where it fails.
macro_rules! march {
    ($matrix:ty, $solver:ty, $method:ident, $system:expr, $tolerance:expr) => {{
        let (system, tolerance): (&System, f64) = ($system, $tolerance);
        let n = system.capacity.len();
        let problem = OdeBuilder::<$matrix>::new()
            .rtol(tolerance * 1e-3)
            .atol(vec![tolerance; n])
            .h0(1.0)
            .rhs_implicit(
                move |x: &[f64], _: &[f64], _: f64, y: &mut [f64]| system.rate(x, y),
                move |x: &[f64], _: &[f64], _: f64, v: &[f64], y: &mut [f64]| system.derivative(x, v, y),
            )
            .init(move |_: &[f64], _: f64, y: &mut [f64]| y.fill(system.start), n)
            .root(move |x: &[f64], _: &[f64], _: f64, y: &mut [f64]| y[0] = x[0] - system.target, 1)
            .build()
            .expect("the problem is well posed");
        let mut solver = problem.$method::<$solver>().expect("the solver starts");
        let mut steps = 0;
        loop {
            match solver.step() {
                Ok(OdeSolverStopReason::RootFound(time, _)) => break (time, steps),
                Ok(_) if steps < MOST_STEPS => steps += 1,
                Ok(_) | Err(_) => break (f64::NAN, steps),
            }
        }
    }};
}

type Sparse = FaerSparseMat<f64>;
type SparseLu = FaerSparseLU<f64>;
type Dense = FaerMat<f64>;
type DenseLu = FaerLU<f64>;
type Method = fn(&System, f64) -> (f64, usize);

const METHODS: [(&str, Method); 4] = [
    ("bdf-sparse", |system, tolerance| march!(Sparse, SparseLu, bdf, system, tolerance)),
    ("bdf-dense", |system, tolerance| march!(Dense, DenseLu, bdf, system, tolerance)),
    ("esdirk34-sparse", |system, tolerance| march!(Sparse, SparseLu, esdirk34, system, tolerance)),
    ("tr_bdf2-dense", |system, tolerance| march!(Dense, DenseLu, tr_bdf2, system, tolerance)),
];

fn numbers(line: &str) -> Vec<f64> {
    line.split_whitespace().map(|word| word.parse().expect("a number")).collect()
}

fn read(lines: &[&str]) -> System {
    let head: Vec<&str> = lines[0].split_whitespace().collect();
    let ends = numbers(lines[3]);
    System {
        name: head[0].to_owned(),
        target: head[1].parse().expect("a number"),
        capacity: numbers(lines[1]),
        link: numbers(lines[2]),
        film: ends[0],
        radiation: ends[1],
        surroundings: ends[2],
        start: ends[3],
    }
}

fn main() {
    let repetitions = std::env::args().nth(1).and_then(|word| word.parse().ok()).unwrap_or(5);
    let mut text = String::new();
    std::io::stdin().read_to_string(&mut text).expect("the systems as text");
    let lines: Vec<&str> = text.lines().collect();
    for system in lines.chunks(5).map(read) {
        for (name, method) in METHODS {
            for tolerance in TOLERANCES {
                report(&system, name, method, tolerance, repetitions);
            }
        }
    }
}

fn report(system: &System, name: &str, method: Method, tolerance: f64, repetitions: usize) {
    let mut answer = (f64::NAN, 0);
    let mut times: Vec<f64> = (0..repetitions)
        .map(|_| {
            let begin = processor_seconds();
            for _ in 0..RUNS {
                answer = method(system, tolerance);
            }
            (processor_seconds() - begin) / RUNS as f64
        })
        .collect();
    times.sort_by(f64::total_cmp);
    let milliseconds = times[times.len() / 2] * 1e3;
    let nodes = system.capacity.len();
    println!("{} {nodes} {name} {tolerance:e} {:.17e} {} {milliseconds:.6}", system.name, answer.0, answer.1);
}
