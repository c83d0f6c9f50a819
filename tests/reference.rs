//! Published and recomputed answers, one file each in `tests/reference/`, against ours.
//!
//! A file holds a scenario, the questions, their answers with source and tolerance, and how far the answer
//! itself is known. Two things are held for each: the answer found is within the tolerance, and where we
//! report a numerical band, the truth lies in it.
//!
//! `cargo test --test reference -- --nocapture` prints the table.

use serde::Deserialize;
use std::f64::consts::TAU;
use stillheat::Solved;
use stillheat::answer::{History, Orders, Outcome, march, mesh};
use stillheat::item::{Item, Region, Side, Watch};

/// Cells across the slowest layer of the two meshes on which single temperatures are computed.
const CELLS: usize = 24;
/// Largest error of a step in their marches, K.
const TOLERANCE: f64 = 1e-3;

/// One file.
#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Case {
    id: String,
    title: String,
    source: String,
    #[serde(rename = "how")]
    _how: String,
    scenario: serde_json::Value,
    expected: Vec<Expected>,
}

/// One question and its answer.
#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Expected {
    ask: Ask,
    value: f64,
    unit: String,
    tolerance_abs: Option<f64>,
    tolerance_rel: Option<f64>,
    /// How far the value itself is known, in its unit: a second way of finding it, and its printed digits.
    known_to: f64,
    #[serde(rename = "why_tolerance")]
    _why_tolerance: String,
}

/// What is asked.
#[derive(Deserialize)]
#[serde(untagged, deny_unknown_fields)]
enum Ask {
    /// When a condition of `ready_when` is first reached, s.
    TimeOf { time_of: usize },
    /// Where the quantity watched by a condition of `ready_when` settles.
    SettlesAt { settles_at: usize },
    /// A temperature at a time, °C.
    Temperature { temperature_at_s: f64, of: Of },
    /// The steady heat out through a face: W/m² of a slab, W/m of a cylinder, W of a sphere.
    HeatOut { heat_out_w: Face },
    /// Half of highest minus lowest over the last period, K.
    Amplitude { amplitude_of: Of, period_s: f64 },
    /// How long after `behind_s` (in every period) it is highest in the last period, s.
    Lag { lag_of: Of, period_s: f64, behind_s: f64 },
}

#[derive(Clone, Copy, Deserialize)]
#[serde(rename_all = "snake_case")]
enum Face {
    Inner,
    Outer,
}

#[derive(Clone, Copy, Deserialize)]
#[serde(rename_all = "snake_case")]
enum Of {
    /// Volume mean of the item.
    Mean,
    /// A face.
    Face(Face),
    /// Distance from the inside, m.
    PlaceM(f64),
}

impl Of {
    fn watch(self) -> Watch {
        match self {
            Self::Mean => Watch::Mean(Region::Whole),
            Self::Face(Face::Inner) => Watch::Face(Side::Inner),
            Self::Face(Face::Outer) => Watch::Face(Side::Outer),
            Self::PlaceM(place) => Watch::Place(place),
        }
    }
}

/// What we found.
struct Found {
    value: f64,
    /// (low, high) where a numerical band is reported.
    band: Option<(f64, f64)>,
}

impl Found {
    fn bare(value: f64) -> Self {
        Self { value, band: None }
    }
}

#[test]
fn every_reference_is_met_and_lies_in_its_band() {
    let mut table = Table::default();
    for case in cases() {
        let solved = match stillheat::solve(&case.scenario.to_string()) {
            Ok(solved) => solved,
            Err(problems) => {
                table.failures.push(format!("{}: {problems:?}", case.id));
                continue;
            }
        };
        for expected in &case.expected {
            table.add(&case, expected, find(&solved, &expected.ask));
        }
    }
    table.print();
    assert!(table.failures.is_empty(), "\n{}", table.failures.join("\n"));
    // The ordinary case; the rest are asked where the curve is flat, where a band is honest when it is wide.
    let narrow = table.share_of_narrow_bands();
    assert!(narrow > 0.9, "only {:.0} % of the bands are under 0.2 %", 100.0 * narrow);
}

#[test]
fn a_saved_and_reopened_case_answers_the_same() {
    for case in cases() {
        let solved = stillheat::solve(&case.scenario.to_string()).expect(&case.id);
        let saved = serde_json::to_string(&solved.scenario).expect(&case.id);
        let again = stillheat::solve(&saved).expect(&case.id);
        let words = |solved: &Solved| serde_json::to_value(&solved.report).expect(&case.id);
        assert_eq!(words(&solved), words(&again), "{}", case.id);
    }
}

fn cases() -> Vec<Case> {
    let folder = std::path::Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/reference");
    let mut files: Vec<_> = std::fs::read_dir(folder).unwrap().map(|entry| entry.unwrap().path()).collect();
    files.sort();
    files
        .iter()
        .map(|file| {
            let text = std::fs::read_to_string(file).unwrap();
            let case: Case =
                serde_json::from_str(&text).unwrap_or_else(|e| panic!("{}: {e}", file.display()));
            assert_eq!(Some(case.id.as_str()), file.file_stem().and_then(|stem| stem.to_str()));
            case
        })
        .collect()
}

fn find(solved: &Solved, ask: &Ask) -> Result<Found, String> {
    let item = &solved.checked.item;
    match *ask {
        Ask::TimeOf { time_of } => match outcome(solved, time_of)? {
            Outcome::At { time_s, low_s, high_s, .. } => {
                Ok(Found { value: *time_s, band: Some((*low_s, *high_s)) })
            }
            other => Err(format!("not reached: {other:?}")),
        },
        Ask::SettlesAt { settles_at } => match outcome(solved, settles_at)? {
            Outcome::Never { settles_at: Some(value) } => Ok(Found::bare(*value)),
            other => Err(format!("does not settle: {other:?}")),
        },
        Ask::Temperature { temperature_at_s: time, of } => {
            let kelvin = extrapolated(item, time, |history| history.watch(&of.watch(), time));
            Ok(Found::bare(stillheat::units::celsius(kelvin)))
        }
        Ask::HeatOut { heat_out_w } => {
            let balance = &solved.report.heat_balance;
            let heat = match heat_out_w {
                Face::Inner => balance.in_inner_j,
                Face::Outer => balance.in_outer_j,
            };
            Ok(Found::bare(-heat / balance.until_s))
        }
        Ask::Amplitude { amplitude_of, period_s } => {
            let amplitude = |history: &History| last_swing(history, amplitude_of, period_s).0;
            Ok(Found::bare(extrapolated(item, item.look_ahead(), amplitude)))
        }
        Ask::Lag { lag_of, period_s, behind_s } => {
            let lag = |history: &History| {
                let highest_at = last_swing(history, lag_of, period_s).1;
                (highest_at - behind_s).rem_euclid(period_s)
            };
            Ok(Found::bare(extrapolated(item, item.look_ahead(), lag)))
        }
    }
}

fn outcome(solved: &Solved, condition: usize) -> Result<&Outcome, String> {
    let report = solved.report.ready_when.get(condition).ok_or("no such condition")?;
    Ok(&report.outcome)
}

/// A number read off the march up to a time, extrapolated from two meshes as the answers are.
fn extrapolated(item: &Item, until: f64, read: impl Fn(&History) -> f64) -> f64 {
    let orders = Orders { tolerance: TOLERANCE, until, stop_when_settled: false, stop_when_reached: false };
    let [coarse, fine] = [0, 1].map(|halvings| {
        let march = march(item, &mesh(item, CELLS, halvings), &[], orders).expect("a start");
        read(&march.history)
    });
    fine + (fine - coarse) / 3.0
}

/// Amplitude (K) and a time of the highest value (s) of the fundamental of the last period.
fn last_swing(history: &History, of: Of, period: f64) -> (f64, f64) {
    let samples = 720;
    let (mut along, mut across) = (0.0, 0.0);
    for i in 0..samples {
        let time = history.end() - period * f64::from(i) / f64::from(samples);
        let phase = TAU * time / period;
        let value = history.watch(&of.watch(), time);
        along += value * libm::cos(phase) * 2.0 / f64::from(samples);
        across += value * libm::sin(phase) * 2.0 / f64::from(samples);
    }
    ((along * along + across * across).sqrt(), libm::atan2(across, along) / TAU * period)
}

/// The table of all cases, and what is wrong in it.
#[derive(Default)]
struct Table {
    rows: Vec<String>,
    failures: Vec<String>,
    /// Width of each band over its answer.
    widths: Vec<f64>,
}

impl Table {
    fn add(&mut self, case: &Case, expected: &Expected, found: Result<Found, String>) {
        let found = match found {
            Ok(found) => found,
            Err(words) => {
                self.failures.push(format!("{} ({}): {words}", case.id, case.title));
                return;
            }
        };
        let tolerance = match (expected.tolerance_abs, expected.tolerance_rel) {
            (Some(absolute), None) => absolute,
            (None, Some(relative)) => relative * expected.value.abs(),
            _ => panic!("{}: one tolerance, absolute or relative", case.id),
        };
        let error = (found.value - expected.value).abs() / tolerance;
        let (band, inside) = match found.band {
            None => (String::new(), true),
            Some((low, high)) => {
                self.widths.push((high - low) / found.value);
                let inside =
                    low - expected.known_to <= expected.value && expected.value <= high + expected.known_to;
                (format!("{} to {}", Short(low), Short(high)), inside)
            }
        };
        let row = format!(
            "{:8} {:>16} {:>16} {:4} {:>38} {:8.4} {:3}  {}",
            case.id,
            Short(expected.value).to_string(),
            Short(found.value).to_string(),
            expected.unit,
            band,
            error,
            if inside { "" } else { "OUT" },
            case.source,
        );
        if !inside || error.is_nan() || error > 1.0 {
            self.failures.push(row.clone());
        }
        self.rows.push(row);
    }

    fn share_of_narrow_bands(&self) -> f64 {
        let narrow = self.widths.iter().filter(|&&width| width < 0.002).count();
        narrow as f64 / self.widths.len() as f64
    }

    fn print(&self) {
        println!(
            "{:8} {:>16} {:>16} {:4} {:>38} {:8} {:3}  source",
            "case", "expected", "found", "unit", "band", "error/tolerance", ""
        );
        for row in &self.rows {
            println!("{row}");
        }
        println!(
            "{} answers, {} with a band; bands under 0.2 %: {:.1} %, widest {:.2} %",
            self.rows.len(),
            self.widths.len(),
            100.0 * self.share_of_narrow_bands(),
            100.0 * self.widths.iter().fold(0.0, |a: f64, &b| a.max(b)),
        );
    }
}

/// Nine digits.
struct Short(f64);

impl std::fmt::Display for Short {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        let whole = self.0.abs().max(1.0).to_string().split('.').next().map_or(1, str::len);
        write!(f, "{:.*}", 9_usize.saturating_sub(whole), self.0)
    }
}
