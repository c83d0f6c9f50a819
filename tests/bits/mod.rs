//! One fingerprint per scenario over every number of its answer, bit by bit.

use std::fmt::Write;
use stillheat::Solved;

/// The fingerprints as they were made natively: name of the scenario, fingerprint.
pub const KEPT: &str = include_str!("kept.txt");

macro_rules! cases {
    ($($name:literal),* $(,)?) => {
        &[$(($name, include_str!(concat!("../reference/", $name, ".json")))),*]
    };
}

/// The reference cases, whose scenario stands under `scenario`.
const CASES: &[(&str, &str)] = cases![
    "A01",
    "A02",
    "A03",
    "A04",
    "A05",
    "B01",
    "B02",
    "B03",
    "B04",
    "B05",
    "C01",
    "C02",
    "D01",
    "D02",
    "D03",
    "E03-02mm",
    "E03-15mm",
    "E03-40mm",
    "F02",
    "G01",
    "G02",
    "G03",
    "H01",
    "H02",
    "H03",
    "L01",
    "L02",
    "L03",
    "L04",
    "O1-sphere",
    "O1",
    "O2",
    "O3",
    "O4",
    "O5",
    "S01",
    "S02",
    "S03",
    "S04-T2",
    "S04-T3",
    "S05",
    "S06",
    "S07",
    "S08",
    "S19",
    "S20",
    "S21",
    "S22",
    "W1",
    "W2",
];

/// A line per scenario: its name and its fingerprint.
pub fn fingerprints() -> String {
    let mut lines = String::new();
    for example in stillheat::scenario::examples() {
        add(&mut lines, example.id, example.text);
    }
    for (name, text) in CASES {
        let case: serde_json::Value = serde_json::from_str(text).expect("a case is JSON");
        add(&mut lines, name, &case["scenario"].to_string());
    }
    lines
}

fn add(lines: &mut String, name: &str, text: &str) {
    let solved = stillheat::solve(text).expect("a scenario that can be solved");
    // Writing into a string cannot fail.
    let _ = writeln!(lines, "{name} {:016x}", fingerprint(&solved));
}

/// FNV-1a (Fowler, Noll, Vo 1991) over the bits of all times and temperatures of both marches.
fn fingerprint(solved: &Solved) -> u64 {
    let mut hash: u64 = 0xcbf2_9ce4_8422_2325;
    let mut take = |x: f64| {
        for byte in x.to_bits().to_le_bytes() {
            hash = (hash ^ u64::from(byte)).wrapping_mul(0x100_0000_01b3);
        }
    };
    for march in [&solved.resolved.coarse, &solved.resolved.fine] {
        for time in march.history.times() {
            take(*time);
            march.history.temperatures(*time).into_iter().for_each(&mut take);
        }
        march.end.heat_in.into_iter().for_each(&mut take);
    }
    for followed in &solved.resolved.followed {
        for moment in &followed.moments {
            [moment.time, moment.low, moment.high].into_iter().for_each(&mut take);
        }
    }
    hash
}
