//! Two meshes, two tolerances: every moment extrapolated, with a band that holds the truth.
//!
//! With `t_c` and `t_f` the moments of the coarse and the fine march, `d` their difference: the moment is
//! `t_f + d/3` (Richardson 1911, order 2) and the band `|d|/3 + tolerance / speed` to both sides, the second
//! part because both marches share the error of the time step, and by chance `d` may be nothing. Where the
//! band is wide, what makes it wide is refined.

use super::cells::{mesh, span};
use super::march::{Crossing, Ending, March, Orders, march};
use super::verdict::{Followed, Timed};
use crate::conduct::{Balance, SteadyError, start_temperatures};
use crate::item::{Condition, Item};

/// The marches behind an answer.
#[derive(Clone, Debug, PartialEq)]
pub struct Resolved {
    /// All conditions, `ready_when` first, then `must_not`.
    pub followed: Vec<Followed>,
    /// To the end of the look-ahead, or until all has settled.
    pub coarse: March,
    /// To a little after the last moment that is asked for.
    pub fine: March,
    /// Tolerances of the two, K.
    pub tolerances: [f64; 2],
    /// Steps taken and not taken, all marches together.
    pub effort: (usize, usize),
}

/// Cells across the slowest layer of the first coarse mesh.
const FIRST_CELLS: usize = 10;
/// Of the last; the fine one has twice as many.
const MOST_CELLS: usize = 160;
/// Tolerance of the coarse march as a part of the temperatures that drive the item, and at most, K.
const TOLERANCE: (f64, f64) = (1.3e-3, 0.1);
/// Finest tolerance, K: rounding is not far below.
const FINEST: f64 = 1e-6;
/// Half width of the band that is good enough, as a part of the time.
const GOOD_BAND: f64 = 8e-4;
/// A moment earlier than this part of the last one is asked no sharper than one at that time.
const EARLY: f64 = 2e-3;
/// Two marches whose moments differ by less than this part of the time are extrapolated.
const IN_STEP: f64 = 0.2;
/// Refinements at most.
const ROUNDS: usize = 6;

/// Marches an item until the moments that matter are known well.
///
/// # Errors
/// Where the start is an earlier steady state that cannot be found.
pub fn resolve(item: &Item) -> Result<Resolved, SteadyError> {
    let conditions: Vec<Condition> = item.ready_when().iter().chain(item.must_not()).cloned().collect();
    let first = mesh(item, FIRST_CELLS, 0);
    let start = start_temperatures(item, &first, &Balance::new(item, &first))?;
    let mut tolerance = (TOLERANCE.0 * span(item, &start)).clamp(10.0 * FINEST, TOLERANCE.1);
    let mut cells = FIRST_CELLS;
    let mut effort = (0, 0);
    for round in 0.. {
        let coarse = march(item, &mesh(item, cells, 0), &conditions, to_the_end(item, tolerance))?;
        let needed = Needed::new(item, &coarse);
        let orders = Orders {
            tolerance: 0.1 * tolerance,
            until: needed.until,
            stop_when_settled: false,
            stop_when_reached: false,
        };
        let fine = march(item, &mesh(item, cells, 1), &conditions, orders)?;
        effort = (effort.0 + coarse.steps + fine.steps, effort.1 + coarse.rejected + fine.rejected);
        let (width, by_mesh) = worst_band(&coarse, &fine, &needed, 0.1 * tolerance);
        let can = if by_mesh { 2 * cells <= MOST_CELLS } else { tolerance > 20.0 * FINEST };
        if width <= GOOD_BAND || !can || round == ROUNDS {
            let followed = follow(&coarse, &fine, &conditions, 0.1 * tolerance);
            return Ok(Resolved { followed, coarse, fine, tolerances: [tolerance, 0.1 * tolerance], effort });
        }
        if by_mesh {
            cells *= 2;
        } else {
            tolerance *= 0.1;
        }
    }
    unreachable!("the loop ends by its last round");
}

fn to_the_end(item: &Item, tolerance: f64) -> Orders {
    Orders { tolerance, until: item.look_ahead(), stop_when_settled: true, stop_when_reached: false }
}

/// The moments that matter, as the coarse march has them.
struct Needed {
    /// Condition and number of the crossing.
    moments: Vec<(usize, usize)>,
    /// The last of them, s.
    last: f64,
    /// How far the fine march has to go, s.
    until: f64,
}

impl Needed {
    /// First moment of each condition; the one that makes the item ready, and where that is lost again.
    fn new(item: &Item, coarse: &March) -> Self {
        let first = (0..coarse.crossings.len()).filter(|&i| !coarse.crossings[i].is_empty()).map(|i| (i, 0));
        let mut moments: Vec<(usize, usize)> = first.collect();
        moments.extend(super::verdict::turning_points(item.ready_when().len(), coarse));
        moments.sort_unstable();
        moments.dedup();
        let last = moments.iter().fold(0.0, |last: f64, &(i, k)| last.max(coarse.crossings[i][k].time));
        let end = if last > 0.0 { 1.2 * last } else { time_of_the_change(coarse) };
        Self { moments, last: last.max(f64::MIN_POSITIVE), until: end.min(item.look_ahead()).max(1e-3) }
    }
}

/// When all but a fortieth of the whole change is over, s.
fn time_of_the_change(coarse: &March) -> f64 {
    let history = &coarse.history;
    let (start, end) = (history.temperatures(0.0), &coarse.end.temperatures);
    let far = |now: &[f64]| now.iter().zip(end).fold(0.0, |most: f64, (a, b)| most.max((a - b).abs()));
    let whole = far(&start);
    let late = history.times().iter().rev().find(|&&time| far(&history.temperatures(time)) > 0.025 * whole);
    let after = history.times().partition_point(|time| Some(time) <= late);
    if coarse.ending == Ending::Repeats {
        return history.end();
    }
    history.times().get(after).copied().unwrap_or_else(|| history.end())
}

/// Widest half band of the moments that matter, as a part of their time, and whether the mesh makes it wide.
fn worst_band(coarse: &March, fine: &March, needed: &Needed, tolerance: f64) -> (f64, bool) {
    let mut worst = (0.0, false);
    for &(i, k) in &needed.moments {
        let rough = coarse.crossings[i][k];
        let found = fine.crossings[i].get(k).filter(|found| found.reached == rough.reached);
        let Some(found) = found else { return (f64::INFINITY, true) };
        let (by_mesh, by_time) = half_band(rough, *found, tolerance);
        // A moment long before the last one need not be as sharp: nobody waits for its thousandth.
        let width = (by_mesh + by_time) / found.time.max(EARLY * needed.last);
        if width > worst.0 {
            worst = (width, by_mesh > by_time);
        }
    }
    worst
}

/// The two parts of the half band, s: what the meshes and what the time steps may be off.
fn half_band(coarse: Crossing, fine: Crossing, tolerance: f64) -> (f64, f64) {
    let by_time = if fine.speed > 0.0 { tolerance / fine.speed } else { fine.time };
    ((fine.time - coarse.time).abs() / 3.0, by_time.min(fine.time))
}

/// What became of every condition, with extrapolated moments where both marches have them.
fn follow(coarse: &March, fine: &March, conditions: &[Condition], tolerance: f64) -> Vec<Followed> {
    let timed = |rough: Crossing, found: Option<&Crossing>| match found {
        Some(found) if found.reached == rough.reached => {
            let (by_mesh, by_time) = half_band(rough, *found, tolerance);
            let apart = found.time - rough.time;
            // Far apart the two are not on their way to the truth in step; then the whole difference is doubt.
            let in_step = apart.abs() < IN_STEP * found.time;
            let time = if in_step { found.time + apart / 3.0 } else { found.time };
            let half = if in_step { by_mesh + by_time } else { apart.abs() + by_time };
            Timed {
                time,
                low: (time - half).max(0.0),
                high: time + half,
                on_fine: found.time,
                reached: rough.reached,
            }
        }
        // Beyond the fine march: the coarse one stands alone, with all of its own doubt.
        _ => {
            let half = 0.02 * rough.time + 10.0 * tolerance / rough.speed.max(f64::MIN_POSITIVE);
            let half = half.min(rough.time);
            let (low, high) = (rough.time - half, rough.time + half);
            Timed { time: rough.time, low, high, on_fine: rough.time, reached: rough.reached }
        }
    };
    let one = |i: usize| {
        let pairs = coarse.crossings[i].iter().enumerate();
        Followed {
            held_at_start: fine.held_at_start[i],
            moments: pairs.map(|(k, rough)| timed(*rough, fine.crossings[i].get(k))).collect(),
            nearest: super::verdict::nearest(coarse, &conditions[i]),
        }
    };
    (0..conditions.len()).map(one).collect()
}
