//! From time zero on, step by step, onto every moment at which a condition is reached or lost.

use super::gauge::Gauge;
use super::history::{History, interpolate};
use super::surroundings::Calendar;
use crate::conduct::{Balance, Moment, Rodas, SteadyError, Tridiagonal, faces_at, start_temperatures};
use crate::item::{Condition, Face, Item, Sense};
use crate::mesh::Mesh;

/// How a march is to be made.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Orders {
    /// Largest error of a step, K.
    pub tolerance: f64,
    /// Where it ends at the latest, s.
    pub until: f64,
    /// End where everything has settled, or repeats itself with the surroundings?
    pub stop_when_settled: bool,
    /// End with the first moment at which each condition has been reached once?
    pub stop_when_reached: bool,
}

/// A moment at which a condition is reached or lost.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Crossing {
    /// s
    pub time: f64,
    /// Does the condition hold from here on?
    pub reached: bool,
    /// How fast the watched quantity passes its limit, K/s (a rate: K/s²); never negative.
    pub speed: f64,
}

/// How a march ended.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Ending {
    /// At the time asked for.
    Until,
    /// Everything has settled.
    Settled,
    /// Everything repeats itself with the surroundings.
    Repeats,
    /// A temperature left every sensible range.
    LeftRange,
    /// No step was short enough.
    Stuck,
}

/// A march that was made.
#[derive(Clone, Debug, PartialEq)]
pub struct March {
    /// Did each condition hold at time zero?
    pub held_at_start: Vec<bool>,
    /// When each condition was reached and lost, in order.
    pub crossings: Vec<Vec<Crossing>>,
    /// All temperatures.
    pub history: History,
    /// The last moment.
    pub end: Moment,
    /// Heat stored more than at the start, J.
    pub stored: f64,
    /// Heat that moved through the faces, in or out, J.
    pub moved: f64,
    /// How it ended.
    pub ending: Ending,
    /// Accepted steps.
    pub steps: usize,
    /// Steps tried and not taken, those to land on a crossing among them.
    pub rejected: usize,
}

/// First step, and the first after the surroundings jump, s; error control finds its own from there.
const FIRST_STEP: f64 = 1.0;
/// A step grows by this factor at most and shrinks by this one.
const GROWTH: (f64, f64) = (0.1, 8.0);
/// Aim this far below the tolerance.
const CAUTION: f64 = 0.9;
/// No temperature of a plant is outside, K.
const RANGE: (f64, f64) = (0.1, 1e4);
/// Attempts to land on a crossing; each at least halves the error in practice.
const LANDINGS: usize = 12;
/// Steps altogether; a day cycle over ten years needs fewer.
const MOST_STEPS: usize = 200_000;

/// Marches an item on a mesh.
///
/// # Errors
/// Where the start is an earlier steady state that cannot be found.
pub fn march(
    item: &Item,
    mesh: &Mesh,
    conditions: &[Condition],
    orders: Orders,
) -> Result<March, SteadyError> {
    let balance = Balance::new(item, mesh);
    let start = start_temperatures(item, mesh, &balance)?;
    let mut walker = Walker::new(item, mesh, &balance, conditions, orders, start);
    let ending = walker.walk();
    Ok(walker.finish(ending))
}

/// The march while it is being made.
struct Walker<'a> {
    item: &'a Item,
    balance: &'a Balance<'a>,
    places: &'a [f64],
    conditions: &'a [Condition],
    gauges: Vec<Gauge>,
    orders: Orders,
    calendar: Calendar,
    method: Rodas<Tridiagonal>,
    faces: [&'a Face; 2],
    at: Moment,
    rates: Vec<f64>,
    /// Value of each condition, below 0 where it holds, and its rate of change.
    margins: Vec<f64>,
    slopes: Vec<Option<f64>>,
    holds: Vec<bool>,
    held_at_start: Vec<bool>,
    crossings: Vec<Vec<Crossing>>,
    history: History,
    first_stored: f64,
    moved: f64,
    step: f64,
    last: Option<(f64, f64)>,
    steps: usize,
    rejected: usize,
    bend: (Vec<f64>, Vec<f64>),
    scratch: Vec<f64>,
}

impl<'a> Walker<'a> {
    fn new(
        item: &'a Item,
        mesh: &'a Mesh,
        balance: &'a Balance<'a>,
        conditions: &'a [Condition],
        orders: Orders,
        start: Vec<f64>,
    ) -> Self {
        let gauges: Vec<Gauge> =
            conditions.iter().map(|condition| Gauge::new(condition.watch, mesh)).collect();
        let first_stored = balance.stored(&start);
        Self {
            item,
            balance,
            places: &mesh.places,
            conditions,
            gauges,
            orders,
            calendar: Calendar::new(item),
            method: Rodas::default(),
            faces: faces_at(item, 0.0),
            history: History::new(mesh.clone(), &start),
            at: balance.moment(start),
            rates: Vec::new(),
            margins: vec![0.0; conditions.len()],
            slopes: vec![None; conditions.len()],
            holds: Vec::new(),
            held_at_start: Vec::new(),
            crossings: vec![Vec::new(); conditions.len()],
            first_stored,
            moved: 0.0,
            step: FIRST_STEP,
            last: None,
            steps: 0,
            rejected: 0,
            bend: (Vec::new(), Vec::new()),
            scratch: Vec::new(),
        }
    }

    fn walk(&mut self) -> Ending {
        self.turn();
        self.holds = self.margins.iter().map(|&margin| margin <= 0.0).collect();
        self.held_at_start.clone_from(&self.holds);
        let mut corner = self.calendar.next(self.item, 0.0).min(self.orders.until);
        loop {
            if self.at.time >= self.orders.until {
                return Ending::Until;
            }
            if self.orders.stop_when_reached && self.all_reached() {
                return Ending::Until;
            }
            if self.steps + self.rejected > MOST_STEPS {
                return Ending::Stuck;
            }
            if let Some(ending) = self.step(corner) {
                return ending;
            }
            if self.at.time >= corner {
                if self.calendar.repeats(corner, &self.at.temperatures, 0.05 * self.orders.tolerance)
                    && self.orders.stop_when_settled
                {
                    return Ending::Repeats;
                }
                self.turn();
                corner = self.calendar.next(self.item, self.at.time).min(self.orders.until);
            } else if self.has_settled() {
                return Ending::Settled;
            }
        }
    }

    /// The surroundings that begin now.
    fn turn(&mut self) {
        let before = self.faces;
        self.faces = faces_at(self.item, self.at.time);
        let jumps = self.at.time == 0.0 || before != self.faces;
        self.step = if jumps { self.step.min(FIRST_STEP) } else { self.step * GROWTH.0 };
        self.last = None;
        self.balance.hold_faces(self.faces, &mut self.at);
        self.look();
        if jumps && self.at.time == 0.0 {
            self.history.restart(&self.at.temperatures);
        }
    }

    /// Flows, rates and conditions of where the march stands.
    fn look(&mut self) {
        self.method.prepare(self.balance, self.faces, &self.at);
        self.method.rates(&mut self.rates);
        for (i, gauge) in self.gauges.iter().enumerate() {
            let value = gauge.value(self.places, &self.at.temperatures, &self.rates);
            let slope = gauge.slope(self.places, &self.at.temperatures, &self.rates);
            self.margins[i] = margin(&self.conditions[i], value);
            self.slopes[i] = slope.map(|slope| signed(&self.conditions[i], slope));
        }
    }

    /// One accepted step, no further than `corner`.
    fn step(&mut self, corner: f64) -> Option<Ending> {
        let room = corner - self.at.time;
        loop {
            let planned = self.step;
            let dt = if planned >= room {
                room
            } else if planned > 0.5 * room {
                0.5 * room
            } else {
                planned
            };
            if dt <= 1e-13 * self.at.time || dt < 1e-12 {
                return if dt == room { self.jump_to(corner) } else { Some(Ending::Stuck) };
            }
            let attempt = self.method.attempt(self.balance, self.faces, &self.at, dt);
            let error = attempt.error / self.orders.tolerance;
            if !(error <= 1.0) {
                self.rejected += 1;
                let factor = if error.is_finite() { CAUTION * fourth_root(1.0 / error) } else { 0.0 };
                self.step = dt * factor.max(GROWTH.0);
                continue;
            }
            self.plan(dt, planned, error);
            self.take(dt, dt == room, corner);
            let range = self.at.temperatures.iter().any(|&t| !(t > RANGE.0 && t < RANGE.1));
            return range.then_some(Ending::LeftRange);
        }
    }

    /// A corner nearer than the rounding of the time.
    fn jump_to(&mut self, corner: f64) -> Option<Ending> {
        self.at.time = corner;
        None
    }

    /// The length of the next step, looking back at the last (Gustafsson 1994).
    fn plan(&mut self, dt: f64, planned: f64, error: f64) {
        let error = error.max(1e-8);
        let mut factor = CAUTION * fourth_root(1.0 / error);
        if let Some((last_dt, last_error)) = self.last {
            factor = factor.min(CAUTION * dt / last_dt * fourth_root(last_error / (error * error)));
        }
        self.last = Some((dt, error));
        let next = dt * factor.clamp(GROWTH.0, GROWTH.1);
        // A step that was cut short at a corner says little about what would have been possible.
        self.step = if dt < planned { next.max(planned) } else { next };
    }

    /// Takes the attempt, or the part of it up to the first crossing.
    fn take(&mut self, dt: f64, to_corner: bool, corner: f64) {
        let crossed = self.first_crossing(dt);
        let landed = crossed.map(|(condition, part)| (condition, self.land(condition, dt, part)));
        self.method.dense(&mut self.bend.0, &mut self.bend.1);
        let before = self.at.heat_in;
        self.method.take(&mut self.at);
        if to_corner && landed.is_none() {
            // Exactly, so that the rows that begin there are found.
            self.at.time = corner;
        }
        self.moved +=
            self.at.heat_in.iter().zip(before).map(|(now, before)| (now - before).abs()).sum::<f64>();
        self.steps += 1;
        self.history.add(self.at.time, &self.at.temperatures, &self.bend.0, &self.bend.1);
        self.look();
        if let Some((condition, between)) = landed {
            self.record(condition, between);
        }
    }

    /// The condition that changes first within the attempt, and about where, as a part of the step.
    fn first_crossing(&mut self, dt: f64) -> Option<(usize, f64)> {
        let mut first: Option<(usize, f64)> = None;
        for i in 0..self.conditions.len() {
            let end = self.margin_at_end(i);
            let flips = (end <= 0.0) != self.holds[i];
            let part = if flips {
                self.part_of_crossing(i, 0.0, 1.0)
            } else if self.turns(i, dt, end) {
                let Some(part) = self.part_of_touch(i, dt) else { continue };
                part
            } else {
                continue;
            };
            if first.is_none_or(|(_, earlier)| part < earlier) {
                first = Some((i, part));
            }
        }
        first
    }

    fn margin_at_end(&mut self, i: usize) -> f64 {
        let next = self.method.next();
        if self.gauges[i].needs_rates() {
            self.balance.rates(self.faces, next, &mut self.scratch);
        }
        margin(&self.conditions[i], self.gauges[i].value(self.places, &next.temperatures, &self.scratch))
    }

    /// Margin within the attempt by its dense output; of a rate the straight line between its ends.
    fn margin_within(&mut self, i: usize, s: f64) -> f64 {
        if self.gauges[i].needs_rates() {
            return (1.0 - s) * self.margins[i] + s * self.margin_at_end(i);
        }
        let mut bend = std::mem::take(&mut self.bend.0);
        bend.extend_from_slice(&self.bend.1);
        let mut within = std::mem::take(&mut self.scratch);
        interpolate(&self.at.temperatures, &self.method.next().temperatures, &bend, s, &mut within);
        let value = self.gauges[i].value(self.places, &within, &[]);
        self.scratch = within;
        bend.truncate(bend.len() / 2);
        self.bend.0 = bend;
        margin(&self.conditions[i], value)
    }

    /// Where, as a part of the step, a condition changes between two parts: bisection and secant in turn.
    fn part_of_crossing(&mut self, i: usize, from: f64, to: f64) -> f64 {
        self.method.dense(&mut self.bend.0, &mut self.bend.1);
        let (mut low, mut high) = (from, to);
        let (mut at_low, mut at_high) = (self.margin_within(i, low), self.margin_within(i, high));
        if (at_low <= 0.0) == (at_high <= 0.0) {
            return from;
        }
        for round in 0..20 {
            let secant = low + (high - low) * at_low / (at_low - at_high);
            let middle = if round % 3 == 2 { 0.5 * (low + high) } else { secant };
            let value = self.margin_within(i, middle);
            if (value <= 0.0) == (at_low <= 0.0) {
                (low, at_low) = (middle, value);
            } else {
                (high, at_high) = (middle, value);
            }
            if high - low < 1e-6 || value.abs() < 1e-3 * self.orders.tolerance {
                break;
            }
        }
        if at_low.abs() < at_high.abs() { low } else { high }
    }

    /// Does the condition head for a change at the start of the attempt and away from it at the end?
    fn turns(&self, i: usize, dt: f64, end: f64) -> bool {
        let Some(slope) = self.slopes[i] else { return false };
        let margin = self.margins[i];
        let towards = if self.holds[i] { slope > 0.0 } else { slope < 0.0 };
        let chord = end - margin;
        // Straight on it would get there, and the chord does not.
        towards && (slope * dt).abs() > margin.abs() && (slope * dt).abs() > 2.0 * chord.abs()
    }

    /// Where a condition changes and changes back within the attempt, if it does.
    fn part_of_touch(&mut self, i: usize, _dt: f64) -> Option<f64> {
        self.method.dense(&mut self.bend.0, &mut self.bend.1);
        for part in 1..16 {
            let s = f64::from(part) / 16.0;
            if (self.margin_within(i, s) <= 0.0) != self.holds[i] {
                return Some(self.part_of_crossing(i, s - 1.0 / 16.0, s));
            }
        }
        None
    }

    /// Shortens the attempt until it ends where the condition changes. Gives the slope between the last two
    /// tries, for quantities that do not know their own.
    fn land(&mut self, i: usize, dt: f64, part: f64) -> f64 {
        let enough = 1e-4 * self.orders.tolerance * if self.gauges[i].needs_rates() { 1.0 / dt } else { 1.0 };
        let (mut low, mut at_low) = (0.0, self.margins[i]);
        let (mut high, mut at_high) = (dt, self.margin_at_end(i));
        let mut slope = (at_high - at_low) / dt;
        let mut trial = (part * dt).max(1e-9 * dt);
        for round in 0..LANDINGS {
            self.rejected += 1;
            self.method.attempt(self.balance, self.faces, &self.at, trial);
            let value = self.margin_at_end(i);
            if value.abs() <= enough {
                break;
            }
            if (value <= 0.0) == self.holds[i] {
                slope = (at_high - value) / (high - trial);
                (low, at_low) = (trial, value);
            } else {
                slope = (value - at_low) / (trial - low);
                (high, at_high) = (trial, value);
            }
            let bracketed = (at_low <= 0.0) != (at_high <= 0.0);
            let secant = low + (high - low) * at_low / (at_low - at_high);
            trial = if round % 4 == 3 || !bracketed { 0.5 * (low + high) } else { secant };
            if !(trial > low && trial < high) || high - low < 1e-10 * dt {
                break;
            }
        }
        slope
    }

    /// Writes down the crossing at which the march has just arrived.
    fn record(&mut self, i: usize, between: f64) {
        let slope = self.slopes[i].unwrap_or(between);
        self.holds[i] = !self.holds[i];
        self.crossings[i].push(Crossing { time: self.at.time, reached: self.holds[i], speed: slope.abs() });
    }

    fn all_reached(&self) -> bool {
        let reached = |(held, crossings): (&bool, &Vec<Crossing>)| *held || !crossings.is_empty();
        self.held_at_start.iter().zip(&self.crossings).all(reached)
    }

    /// Nothing changes any more, and nothing is going to.
    fn has_settled(&mut self) -> bool {
        if !self.orders.stop_when_settled || self.at.time < self.calendar.last_change() {
            return false;
        }
        // Not before the steps grow with the time itself; asking costs a sixth of a step.
        self.step > 0.2 * (self.at.time - self.calendar.last_change())
            && self.method.distance_to_steady(1e3 * self.item.look_ahead()) < 0.05 * self.orders.tolerance
    }

    fn finish(self, ending: Ending) -> March {
        March {
            stored: self.balance.stored_since(&self.at, self.first_stored),
            moved: self.moved,
            held_at_start: self.held_at_start,
            crossings: self.crossings,
            history: self.history,
            end: self.at,
            ending,
            steps: self.steps,
            rejected: self.rejected,
        }
    }
}

/// Below 0 where the condition holds: K (a rate: K/s).
pub(super) fn margin(condition: &Condition, value: f64) -> f64 {
    signed(condition, value - condition.limit)
}

fn signed(condition: &Condition, value: f64) -> f64 {
    match condition.sense {
        Sense::Below => value,
        Sense::Above => -value,
    }
}

fn fourth_root(x: f64) -> f64 {
    x.sqrt().sqrt()
}
