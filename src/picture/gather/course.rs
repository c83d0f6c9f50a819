//! The columns of the curve: what is watched over time, its limits, and what happens when.

use super::Shown;
use crate::answer::{ConditionReport, Outcome};
use crate::item::{Condition, Region, Sense, Side, Watch};
use crate::picture::{Cursor, Curve, CurveLine, Event, EventKind, Limit, Picture};

/// No two times are further apart than this part of the course, so that lines look round.
const COARSEST: f64 = 1.0 / 160.0;
/// No two times are nearer than this part of the course: less than a pixel.
const FINEST: f64 = 1.0 / 1_600.0;
/// More lines than this cannot be followed.
const MOST_LINES: usize = 4;

impl Shown<'_> {
    pub(super) fn curve(&self, time: f64, then: &mut dyn FnMut(&dyn Picture)) {
        let times = self.times();
        let history = &self.solved.resolved.fine.history;
        let watched = self.watched();
        let watches: Vec<Watch> = watched.iter().map(|line| line.1).collect();
        let mut values = history.courses(&watches, &times);
        for value in values.iter_mut().flatten() {
            *value = self.system.temperature(*value);
        }
        let lines: Vec<CurveLine> = watched
            .iter()
            .zip(&values)
            .map(|((name, _), values)| CurveLine { name, values, band: None })
            .collect();
        let (limits, events) = (self.limits(), self.events());
        let limits: Vec<Limit> = limits.iter().map(|(value, words)| Limit { value: *value, words }).collect();
        let events: Vec<Event> = events
            .iter()
            .map(|(kind, time, value, words)| Event { time: *time, value: *value, words, kind: *kind })
            .collect();
        then(&Curve {
            times: &times,
            lines: &lines,
            limits: &limits,
            events: &events,
            cursor: Some(Cursor { time, words: &self.short_words(time) }),
            stop: self.solved.checked.clock,
            unit: self.system.temperature_unit(),
        });
    }

    /// The times of the steps, none too near and none too far from the next.
    fn times(&self) -> Vec<f64> {
        let end = self.end();
        let mut times = vec![0.0];
        for &step in self.solved.resolved.fine.history.times() {
            let last = times[times.len() - 1];
            if step - last < FINEST * end && step < end {
                continue;
            }
            let parts = ((step - last) / (COARSEST * end)).ceil();
            let mut part = 1.0;
            while part < parts {
                times.push(last + (step - last) * part / parts);
                part += 1.0;
            }
            if step > last {
                times.push(step);
            }
        }
        times
    }

    fn conditions(&self) -> impl Iterator<Item = &Condition> {
        let item = &self.solved.checked.item;
        item.ready_when().iter().chain(item.must_not())
    }

    /// Lines of the curve: what conditions watch, and the hottest and the outer face where that is little.
    fn watched(&self) -> Vec<(String, Watch)> {
        let mut all: Vec<(String, Watch)> = Vec::new();
        let mut add = |name: &str, watch: Watch, most: usize| {
            if all.len() < most && !all.iter().any(|other| other.1 == watch) {
                all.push((name.to_owned(), watch));
            }
        };
        for condition in self.conditions().filter(|condition| is_temperature(condition.watch)) {
            add(&condition.subject, condition.watch, MOST_LINES);
        }
        for probe in self.solved.checked.item.probes() {
            add(&probe.name, Watch::Place(probe.from_inside), MOST_LINES);
        }
        add("hottest", Watch::Hottest(Region::Whole), 1);
        add("outer face", Watch::Face(Side::Outer), 2);
        all
    }

    fn limits(&self) -> Vec<(f64, String)> {
        let mut all: Vec<(f64, String)> = Vec::new();
        for condition in self.conditions().filter(|condition| is_temperature(condition.watch)) {
            let side = match condition.sense {
                Sense::Below => "below",
                Sense::Above => "above",
            };
            let limit = self.system.temperature_words(condition.limit);
            let words = format!("{} {side} {limit}", condition.subject);
            if !all.iter().any(|other| other.1 == words) {
                all.push((self.system.temperature(condition.limit), words));
            }
        }
        all
    }

    /// When it is ready and until when it may stand, each at the limit that decides.
    fn events(&self) -> Vec<(EventKind, f64, Option<f64>, String)> {
        let (item, report) = (&self.solved.checked.item, &self.solved.report);
        let answers = [
            (EventKind::Ready, "ready", &report.ready, item.ready_when(), &report.ready_when),
            (EventKind::Standing, "limit", &report.standing, item.must_not(), &report.must_not),
        ];
        let mut all = Vec::new();
        for (kind, word, outcome, conditions, said) in answers {
            let Some(time) = outcome.as_ref().and_then(reached) else { continue };
            let value = conditions
                .iter()
                .zip(said.iter())
                .find(|(condition, said)| is_temperature(condition.watch) && decides(said, time))
                .map(|(condition, _)| self.system.temperature(condition.limit));
            all.push((kind, time, value, format!("{word} {}", self.short_words(time))));
        }
        all
    }
}

fn reached(outcome: &Outcome) -> Option<f64> {
    match outcome {
        Outcome::At { time_s, .. } => Some(*time_s),
        Outcome::Already { .. } | Outcome::Never { .. } | Outcome::NotWithin { .. } => None,
    }
}

/// Is this the condition whose time is the time of all together?
fn decides(said: &ConditionReport, time: f64) -> bool {
    reached(&said.outcome).is_some_and(|own| (own - time).abs() <= 1e-9 * time.abs())
}

fn is_temperature(watch: Watch) -> bool {
    !matches!(watch, Watch::Difference(_) | Watch::Rate(_))
}
