//! Halving every cell quarters the error of a ready time, for every shape and what lies in its layers.

use stillheat::answer::{Orders, march, mesh};

/// Cells across the slowest layer of the coarsest mesh.
const CELLS: usize = 8;
/// Largest error of a step, K: far below what the meshes make.
const TOLERANCE: f64 = 1e-6;
/// Ratio of the errors of two meshes; 4 is order 2, and the next order of the error shows on coarse meshes.
const RATIOS: std::ops::Range<f64> = 3.3..5.0;

/// Cases of `tests/reference/` whose first answer is the time of their first condition.
const CASES: [(&str, &str); 6] = [
    ("slab, film", include_str!("reference/W1.json")),
    ("cylinder of three layers, film and radiation", include_str!("reference/W2.json")),
    ("sphere, strong film", include_str!("reference/A03.json")),
    ("hollow cylinder, two films", include_str!("reference/C02.json")),
    ("slab of three layers, contacts", include_str!("reference/D01.json")),
    ("conductivity and heat capacity over temperature", include_str!("reference/H02.json")),
];

#[test]
fn halving_every_cell_quarters_the_error() {
    for (name, case) in CASES {
        let case: serde_json::Value = serde_json::from_str(case).unwrap();
        let truth = case["expected"][0]["value"].as_f64().unwrap();
        let solved = stillheat::solve(&case["scenario"].to_string()).unwrap();
        let item = &solved.checked.item;
        let until = item.look_ahead();
        let orders =
            Orders { tolerance: TOLERANCE, until, stop_when_settled: false, stop_when_reached: true };
        let errors = [0, 1, 2].map(|halvings| {
            let march = march(item, &mesh(item, CELLS, halvings), &item.ready_when()[..1], orders).unwrap();
            march.crossings[0][0].time / truth - 1.0
        });
        println!("{name}: {errors:?}");
        for pair in errors.windows(2) {
            let ratio = pair[0] / pair[1];
            assert!(RATIOS.contains(&ratio), "{name}: {errors:?}, ratio {ratio}");
        }
    }
}
