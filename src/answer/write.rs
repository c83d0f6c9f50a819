//! Writes the report: numbers leave the core here, in °C and s, with their words.

use super::report::{ConditionReport, Course, Effort, HandFormula, HeatBalance, Outcome, Report, State};
use super::resolve::Resolved;
use super::verdict::{Followed, Verdict, all_of, any_of};
use super::{Ending, History, words};
use crate::conduct::Balance;
use crate::item::{Condition, Item, Region, Shape, Side, Watch};
use crate::problem::Problem;
use crate::units::celsius;
use crate::units::clock::Clock;

/// A change of temperature that can be told from rounding to nine digits, K.
const FELT: f64 = 0.1;

/// What the report needs beside the item and its marches.
pub struct Circumstances {
    /// What the question is called.
    pub title: String,
    /// The wall clock at time zero.
    pub clock: Option<Clock>,
    /// Allowed, but unusual.
    pub warnings: Vec<Problem>,
    /// Hand formulas, the nearest first.
    pub by_hand: Vec<HandFormula>,
}

/// The report on an item that was marched.
pub fn report(item: &Item, resolved: &Resolved, about: Circumstances) -> Report {
    let writer = Writer { item, resolved, clock: about.clock };
    let (ready, must_not) = resolved.followed.split_at(item.ready_when().len());
    let ending = resolved.coarse.ending;
    let ready_verdict = (!ready.is_empty()).then(|| all_of(ready, ending));
    let standing_verdict = (!must_not.is_empty()).then(|| any_of(must_not, ending));
    let (headline, detail) = writer.headline(ready_verdict.as_ref(), standing_verdict.as_ref());
    let course = writer.course();
    let heat_balance = writer.heat_balance();
    let effort = writer.effort();
    let decisive =
        [ready_verdict, standing_verdict].into_iter().flatten().find_map(|verdict| match verdict {
            Verdict::At { moment, .. } => Some(moment),
            Verdict::Already { .. } | Verdict::Never | Verdict::NotWithin => None,
        });
    let checks = words::checks(decisive, &heat_balance, &effort, about.clock);
    Report {
        stillheat: crate::scenario::VERSION,
        title: about.title,
        headline,
        detail,
        ready: ready_verdict.map(|verdict| writer.outcome(&verdict, None)),
        ready_when: writer.conditions(item.ready_when(), ready, false),
        standing: standing_verdict.map(|verdict| writer.outcome(&verdict, None)),
        must_not: writer.conditions(item.must_not(), must_not, true),
        heat_balance,
        by_hand: about.by_hand,
        cautions: cautions(&course),
        course,
        checks,
        effort,
        warnings: about.warnings,
    }
}

struct Writer<'a> {
    item: &'a Item,
    resolved: &'a Resolved,
    clock: Option<Clock>,
}

impl Writer<'_> {
    fn headline(&self, ready: Option<&Verdict>, standing: Option<&Verdict>) -> (String, String) {
        let look_ahead = self.item.look_ahead();
        let nearest: Vec<f64> = self.resolved.followed.iter().map(|one| one.nearest).collect();
        let stands =
            standing.map(|verdict| words::standing(verdict, self.first_limit(), look_ahead, self.clock));
        match (ready, stands) {
            (Some(ready), stands) => {
                let conditions = self.item.ready_when();
                let (headline, detail) =
                    words::ready(ready, conditions, &nearest[..conditions.len()], look_ahead, self.clock);
                let more = stands.map_or_else(String::new, |(line, rest)| format!(" {line}: {rest}"));
                (headline, detail + &more)
            }
            (None, Some(stands)) => stands,
            (None, None) => (
                "Nothing is asked yet".to_owned(),
                "Say when it is ready, or what must not happen while it stands.".to_owned(),
            ),
        }
    }

    /// The limit that is crossed first.
    fn first_limit(&self) -> Option<&Condition> {
        let must_not = self.item.must_not();
        let followed = &self.resolved.followed[self.item.ready_when().len()..];
        let first_at = |one: &Followed| {
            if one.held_at_start { Some(0.0) } else { one.moments.first().map(|moment| moment.time) }
        };
        must_not
            .iter()
            .zip(followed)
            .filter_map(|(condition, one)| first_at(one).map(|at| (condition, at)))
            .min_by(|a, b| a.1.total_cmp(&b.1))
            .map(|(condition, _)| condition)
    }

    fn conditions(
        &self,
        conditions: &[Condition],
        followed: &[Followed],
        limits: bool,
    ) -> Vec<ConditionReport> {
        let repeats = self.resolved.coarse.ending == Ending::Repeats;
        let one = |(condition, followed): (&Condition, &Followed)| {
            let verdict = all_of(std::slice::from_ref(followed), self.resolved.coarse.ending);
            let look_ahead = self.item.look_ahead();
            // Of a limit the first crossing counts, whatever comes after it.
            let told = if limits { verdict.first_only() } else { verdict };
            ConditionReport {
                path: condition.path.clone(),
                words: words::condition(condition),
                outcome: self.outcome(&verdict, Some((condition, followed))),
                outcome_words: words::outcome(
                    &told,
                    condition,
                    followed.nearest,
                    repeats,
                    look_ahead,
                    self.clock,
                ),
            }
        };
        conditions.iter().zip(followed).map(one).collect()
    }

    fn outcome(&self, verdict: &Verdict, of: Option<(&Condition, &Followed)>) -> Outcome {
        let value = of.map(|(condition, one)| words::in_unit_of_the_limit(condition, one.nearest));
        match *verdict {
            Verdict::Already { lost, for_good } => Outcome::Already {
                lost_again_s: lost.map(|lost| lost.time),
                for_good_from_s: for_good.map(|good| good.time),
            },
            Verdict::At { moment, lost, for_good } => Outcome::At {
                time_s: moment.time,
                low_s: moment.low,
                high_s: moment.high,
                clock: self.clock.and_then(|clock| clock.after(moment.time)).map(Clock::iso),
                lost_again_s: lost.map(|lost| lost.time),
                for_good_from_s: for_good.map(|good| good.time),
                state: self.state_near(moment.on_fine),
            },
            Verdict::Never => Outcome::Never { settles_at: value },
            Verdict::NotWithin => Outcome::NotWithin { look_ahead_s: self.item.look_ahead(), then: value },
        }
    }

    /// From the fine march where it reaches, else from the coarse one.
    fn state_near(&self, time: f64) -> State {
        let fine = &self.resolved.fine.history;
        state(if time <= fine.end() { fine } else { &self.resolved.coarse.history }, self.item, time)
    }

    fn course(&self) -> Course {
        let fine = &self.resolved.fine.history;
        Course {
            start: state(fine, self.item, 0.0),
            end: state(fine, self.item, fine.end()),
            end_s: fine.end(),
            settles: self.resolved.coarse.ending == Ending::Settled,
        }
    }

    fn heat_balance(&self) -> HeatBalance {
        let fine = &self.resolved.fine;
        let [inner, outer] = fine.end.heat_in;
        let moved = self.moved();
        let error = (fine.stored - inner - outer).abs();
        HeatBalance {
            per: match self.item.shape() {
                Shape::Slab => "per m² of face",
                Shape::Cylinder { .. } => "per m of length",
                Shape::Sphere { .. } => "for the whole",
            },
            until_s: fine.end.time,
            stored_j: fine.stored,
            in_inner_j: inner,
            in_outer_j: outer,
            relative_error: error / moved,
        }
    }

    /// Heat that moved, J: through the faces, or from one place of a closed item to another.
    ///
    /// At least that of [`FELT`] throughout: where less happens, the rounding of the temperatures shows.
    fn moved(&self) -> f64 {
        let fine = &self.resolved.fine;
        let mut capacities = Vec::new();
        Balance::new(self.item, fine.history.mesh()).capacities(&fine.end.temperatures, &mut capacities);
        let (start, end) = (fine.history.temperatures(0.0), &fine.end.temperatures);
        let changes = start.iter().zip(end).map(|(before, after)| (after - before).abs().max(FELT));
        let inside: f64 = capacities.iter().zip(changes).map(|(capacity, change)| capacity * change).sum();
        fine.moved.max(inside)
    }

    fn effort(&self) -> Effort {
        let nodes = |history: &History| history.places().len();
        Effort {
            nodes: [nodes(&self.resolved.coarse.history), nodes(&self.resolved.fine.history)],
            tolerance_k: self.resolved.tolerances,
            steps: self.resolved.effort.0,
            rejected: self.resolved.effort.1,
        }
    }
}

/// The item at a time, °C.
fn state(history: &History, item: &Item, time: f64) -> State {
    let read = |watch: Watch| celsius(history.watch(&watch, time));
    State {
        hottest_c: read(Watch::Hottest(Region::Whole)),
        coldest_c: read(Watch::Coldest(Region::Whole)),
        layer_means_c: (0..item.layers().len()).map(|i| read(Watch::Mean(Region::Layer(i)))).collect(),
        inside_c: read(Watch::Face(Side::Inner)),
        outside_c: read(Watch::Face(Side::Outer)),
    }
}

/// Long contact with a surface hotter than this can burn, °C. Source: ISO 13732-1:2006, from memory.
const LONG_CONTACT_C: f64 = 43.0;
/// Water-like contents are near freezing below this, °C. Common practice, no source.
const NEAR_FREEZING_C: f64 = 3.0;

/// Cautions that go with these temperatures; local rules and licensed practice decide.
fn cautions(course: &Course) -> Vec<String> {
    let mut all = Vec::new();
    let hottest = course.start.hottest_c.max(course.end.hottest_c);
    if hottest > LONG_CONTACT_C {
        all.push(
            "Hot contents and surfaces: opening and entry follow the site's permit, with a measured temperature. \
             This page calculates; it does not release."
                .to_owned(),
        );
    }
    if course.start.outside_c.max(course.end.outside_c) > LONG_CONTACT_C {
        all.push(
            "The outer face is above 43 °C at some time: long contact with bare skin can burn (ISO 13732-1:2006, \
             from memory). Bare metal burns sooner than lagging or wood."
                .to_owned(),
        );
    }
    if course.start.coldest_c > 0.0 && course.end.coldest_c < NEAR_FREEZING_C {
        all.push(
            "Near freezing: the heat of freezing and its expansion are not calculated here. Valves, supports and \
             dead legs freeze first."
                .to_owned(),
        );
    }
    all
}
