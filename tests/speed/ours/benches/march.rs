//! The march on one mesh, and the whole answer, of the two workloads of the speed comparison.

use criterion::{Criterion, criterion_group, criterion_main};
use std::hint::black_box;
use stillheat::answer::{Orders, march, mesh};

/// Workload, its case in `tests/reference/`, cells across its slowest layer.
const WORKLOADS: [(&str, &str, usize); 2] = [
    ("W1", include_str!("../../../reference/W1.json"), 12),
    ("W2", include_str!("../../../reference/W2.json"), 10),
];
/// Largest error of a step, K.
const TOLERANCE: f64 = 0.03;

fn workloads(bench: &mut Criterion) {
    for (name, case, cells) in WORKLOADS {
        let case: serde_json::Value = serde_json::from_str(case).expect("JSON");
        let text = case["scenario"].to_string();
        let item = stillheat::solve(&text).expect("a valid scenario").checked.item;
        let mesh = mesh(&item, cells, 0);
        let until = item.look_ahead();
        let orders =
            Orders { tolerance: TOLERANCE, until, stop_when_settled: false, stop_when_reached: true };
        bench.bench_function(&format!("{name} march"), |run| {
            run.iter(|| march(black_box(&item), &mesh, item.ready_when(), orders));
        });
        bench.bench_function(&format!("{name} whole answer"), |run| {
            run.iter(|| {
                stillheat::solve(black_box(&text)).map(|solved| serde_json::to_string(&solved.report))
            });
        });
    }
}

criterion_group!(benches, workloads);
criterion_main!(benches);
