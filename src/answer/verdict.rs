//! From the moments of single conditions to: ready from then on, lost again, never.

use super::march::{Ending, March, margin};
use crate::item::Condition;

/// A moment at which a condition is reached or lost, with its numerical band.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Timed {
    /// Extrapolated from two meshes, s.
    pub time: f64,
    /// Lower end of the band, s.
    pub low: f64,
    /// Upper end of the band, s.
    pub high: f64,
    /// Where the fine march has it, s: there its temperatures are those of the moment.
    pub on_fine: f64,
    /// Does the condition hold from here on?
    pub reached: bool,
}

/// One condition from the start to the end of what was computed.
#[derive(Clone, Debug, PartialEq)]
pub struct Followed {
    /// Did it hold at time zero?
    pub held_at_start: bool,
    /// When it was reached and lost, in order.
    pub moments: Vec<Timed>,
    /// Where the watched quantity ends, or, where all repeats itself, how near it comes to the limit; K (a
    /// rate: K/s).
    pub nearest: f64,
}

/// What became of a condition, or of all of them together.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Verdict {
    /// It holds from the start.
    Already {
        /// When it is lost again.
        lost: Option<Timed>,
        /// From when on it holds to the end, where that is later.
        for_good: Option<Timed>,
    },
    /// It is reached.
    At {
        /// When.
        moment: Timed,
        /// When it is lost again.
        lost: Option<Timed>,
        /// From when on it holds to the end, where that is later.
        for_good: Option<Timed>,
    },
    /// All settles, or repeats itself, without it.
    Never,
    /// It is not reached within the time looked ahead.
    NotWithin,
}

impl Verdict {
    /// The same without what comes after the first time.
    #[must_use]
    pub fn first_only(self) -> Self {
        match self {
            Self::Already { .. } => Self::Already { lost: None, for_good: None },
            Self::At { moment, .. } => Self::At { moment, lost: None, for_good: None },
            Self::Never | Self::NotWithin => self,
        }
    }
}

/// A time over which all conditions hold.
#[derive(Clone, Copy, Debug, PartialEq)]
struct Spell {
    /// None: from the start.
    from: Option<Timed>,
    /// None: to the end.
    to: Option<Timed>,
}

/// The verdict over conditions that must all hold at once.
pub fn all_of(followed: &[Followed], ending: Ending) -> Verdict {
    let timelines: Vec<(bool, &[Timed])> =
        followed.iter().map(|one| (one.held_at_start, one.moments.as_slice())).collect();
    verdict(&spells(&timelines, |held| held.iter().all(|&held| held)), ending)
}

/// The verdict over conditions of which the first counts.
pub fn any_of(followed: &[Followed], ending: Ending) -> Verdict {
    let timelines: Vec<(bool, &[Timed])> =
        followed.iter().map(|one| (one.held_at_start, one.moments.as_slice())).collect();
    verdict(&spells(&timelines, |held| held.iter().any(|&held| held)), ending)
}

/// The times over which a rule over all conditions is true.
fn spells(timelines: &[(bool, &[Timed])], rule: impl Fn(&[bool]) -> bool) -> Vec<Spell> {
    let mut held: Vec<bool> = timelines.iter().map(|timeline| timeline.0).collect();
    let mut moments: Vec<(usize, Timed)> = Vec::new();
    for (i, (_, of_one)) in timelines.iter().enumerate() {
        moments.extend(of_one.iter().map(|moment| (i, *moment)));
    }
    moments.sort_by(|a, b| a.1.time.total_cmp(&b.1.time));
    let mut all = Vec::new();
    let mut open = rule(&held).then_some(Spell { from: None, to: None });
    for (i, moment) in moments {
        held[i] = moment.reached;
        match (&mut open, rule(&held)) {
            (None, true) => open = Some(Spell { from: Some(moment), to: None }),
            (Some(spell), false) => {
                all.push(Spell { to: Some(moment), ..*spell });
                open = None;
            }
            (None, false) | (Some(_), true) => {}
        }
    }
    all.extend(open);
    if let [first, second, ..] = all.as_slice()
        && let (None, Some(lost), Some(again)) = (first.from, first.to, second.from)
        && lost.time < FIRST_MOMENTS * again.time
    {
        all.remove(0);
    }
    all
}

/// What holds at the stop only for this part of the time until it holds again is no answer: a difference that
/// is nothing at first and grows at once.
const FIRST_MOMENTS: f64 = 2e-3;

fn verdict(spells: &[Spell], ending: Ending) -> Verdict {
    let Some(first) = spells.first() else {
        return match ending {
            Ending::Settled | Ending::Repeats => Verdict::Never,
            Ending::Until | Ending::LeftRange | Ending::Stuck => Verdict::NotWithin,
        };
    };
    let last = &spells[spells.len() - 1];
    let for_good = if spells.len() > 1 && last.to.is_none() { last.from } else { None };
    match first.from {
        None => Verdict::Already { lost: first.to, for_good },
        Some(moment) => Verdict::At { moment, lost: first.to, for_good },
    }
}

/// The crossings of a march (condition, number) at which all of the first `ready` conditions become true
/// together, and at which that is lost.
pub fn turning_points(ready: usize, march: &March) -> Vec<(usize, usize)> {
    let mut held: Vec<bool> = march.held_at_start[..ready].to_vec();
    let mut moments: Vec<(f64, usize, usize)> = Vec::new();
    for (i, crossings) in march.crossings[..ready].iter().enumerate() {
        moments.extend(crossings.iter().enumerate().map(|(k, crossing)| (crossing.time, i, k)));
    }
    moments.sort_by(|a, b| a.0.total_cmp(&b.0));
    let mut was = ready > 0 && held.iter().all(|&held| held);
    let mut found = Vec::new();
    for (_, i, k) in moments {
        held[i] = march.crossings[i][k].reached;
        let is = held.iter().all(|&held| held);
        if is != was {
            found.push((i, k));
            was = is;
        }
        // Reached, and lost once: what comes and goes after that is told from the coarse march.
        if found.len() == 2 {
            break;
        }
    }
    found
}

/// Where the watched quantity ends; where all repeats itself, its value nearest to holding in the last round.
pub fn nearest(march: &March, condition: &Condition) -> f64 {
    let history = &march.history;
    if march.ending != Ending::Repeats {
        return history.watch(&condition.watch, history.end());
    }
    let from = history.times().len().saturating_sub(ROUND_STEPS);
    let values = history.times()[from..].iter().map(|&time| history.watch(&condition.watch, time));
    values.min_by(|a, b| margin(condition, *a).total_cmp(&margin(condition, *b))).unwrap_or(f64::NAN)
}

/// Steps that surely reach over one round of a cycle.
const ROUND_STEPS: usize = 400;

#[cfg(test)]
mod tests {
    use super::*;

    fn at(time: f64, reached: bool) -> Timed {
        Timed { time, low: time, high: time, on_fine: time, reached }
    }

    fn followed(held_at_start: bool, moments: &[Timed]) -> Followed {
        Followed { held_at_start, moments: moments.to_vec(), nearest: 0.0 }
    }

    #[test]
    fn all_must_hold_at_once() {
        let first = followed(false, &[at(10.0, true), at(20.0, false), at(40.0, true)]);
        let second = followed(false, &[at(15.0, true)]);
        let found = all_of(&[first, second], Ending::Settled);
        let expected = Verdict::At {
            moment: at(15.0, true),
            lost: Some(at(20.0, false)),
            for_good: Some(at(40.0, true)),
        };
        assert_eq!(found, expected);
    }

    #[test]
    fn the_first_that_happens_counts() {
        let never = followed(false, &[]);
        let later = followed(false, &[at(7.0, true)]);
        let found = any_of(&[never.clone(), later], Ending::Until);
        assert_eq!(found, Verdict::At { moment: at(7.0, true), lost: None, for_good: None });
        let alone = std::slice::from_ref(&never);
        assert_eq!(any_of(alone, Ending::Until), Verdict::NotWithin);
        assert_eq!(any_of(alone, Ending::Settled), Verdict::Never);
    }
}
