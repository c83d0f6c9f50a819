//! Our own rows of the speed comparison: the march on a given mesh, and the whole answer.
//!
//! Arguments: repetitions, then for each workload its name, its file in `tests/reference/` and its meshes, each as
//! cells across the slowest layer and how often all cells are halved: `W2 W2.json 5:0,6:0,5:1`. Standard output,
//! one line per mesh and tolerance: `name nodes method tolerance time steps milliseconds`.

use std::hint::black_box;
use stillheat::answer::{Ending, Orders, march, mesh};

/// Tolerances tried, K.
const TOLERANCES: [f64; 7] = [1.0, 0.3, 0.1, 0.03, 1e-2, 1e-3, 1e-4];
/// Runs in one measurement: one alone is shorter than the clock is sure of.
const RUNS: usize = 20;

unsafe extern "C" {
    fn clock_gettime(id: i32, time: *mut [i64; 2]) -> i32;
}

/// Processor time of this process, s (Linux: clock 2).
fn processor_seconds() -> f64 {
    let mut time = [0_i64; 2];
    unsafe { clock_gettime(2, &raw mut time) };
    time[0] as f64 + time[1] as f64 * 1e-9
}

/// Median milliseconds of one run.
fn milliseconds(repetitions: usize, mut run: impl FnMut()) -> f64 {
    let mut times: Vec<f64> = (0..repetitions)
        .map(|_| {
            let begin = processor_seconds();
            for _ in 0..RUNS {
                run();
            }
            (processor_seconds() - begin) / RUNS as f64
        })
        .collect();
    times.sort_by(f64::total_cmp);
    times[times.len() / 2] * 1e3
}

fn main() {
    let arguments: Vec<String> = std::env::args().skip(1).collect();
    let repetitions = number(&arguments[0]);
    for workload in arguments[1..].chunks(3) {
        let case = std::fs::read_to_string(&workload[1]).expect("the file of the workload");
        let case: serde_json::Value = serde_json::from_str(&case).expect("JSON");
        let text = case["scenario"].to_string();
        for written in workload[2].split(',') {
            let (cells, halvings) = written.split_once(':').expect("cells:halvings");
            marches(&workload[0], &text, number(cells), number(halvings), repetitions);
        }
        whole_answer(&workload[0], &text, repetitions);
    }
}

fn number<T: std::str::FromStr>(word: &str) -> T {
    word.parse().ok().expect("a number")
}

fn marches(name: &str, text: &str, cells: usize, halvings: u32, repetitions: usize) {
    let solved = stillheat::solve(text).expect("a valid scenario");
    let item = &solved.checked.item;
    let mesh = mesh(item, cells, halvings);
    for tolerance in TOLERANCES {
        let orders =
            Orders { tolerance, until: item.look_ahead(), stop_when_settled: false, stop_when_reached: true };
        let run = || march(item, &mesh, item.ready_when(), orders).expect("a start");
        let found = run();
        let time = if found.ending == Ending::Until { found.crossings[0][0].time } else { f64::NAN };
        let cost = milliseconds(repetitions, || {
            black_box(run());
        });
        println!("{name} {} march {tolerance:e} {time:.17e} {} {cost:.6}", mesh.nodes(), found.steps);
    }
}

/// Text in, text out.
fn whole_answer(name: &str, text: &str, repetitions: usize) {
    let run = || {
        let solved = stillheat::solve(text).expect("a valid scenario");
        let result = serde_json::to_string(&solved.report).expect("a report is JSON");
        (solved.report, result)
    };
    let (report, _) = run();
    let Some(stillheat::answer::Outcome::At { time_s, .. }) = report.ready else {
        panic!("{name} has a ready time")
    };
    let cost = milliseconds(repetitions, || {
        black_box(run());
    });
    let effort = &report.effort;
    println!(
        "{name} {} answer {:e} {time_s:.17e} {} {cost:.6}",
        effort.nodes[1], effort.tolerance_k[1], effort.steps
    );
}
