//! Do the layers around the one that stores most follow it as the formulas take them to?

use super::verdict::{Verdict, percent};

/// They may hold up to this part of the heat.
const HOLD_BELOW: f64 = 0.35;

/// What they hold, times their own lag in time constants, may shift the decay by this part.
const SHIFT_BELOW: f64 = 0.03;

/// What they hold at the start may be wrong by a tenth of itself; that may shift the time by this part.
const BEGIN_BELOW: f64 = 0.05;

/// They have settled in after this many of their own diffusion times: what is left of the start is
/// exp(-pi^2 / 4 x 1.5), 2.5 %, where one side is insulated, and less elsewhere.
const SETTLED_AFTER: f64 = 1.5;

/// Before that they may hold this part, against the time constants gone.
const HARDLY_COUNTS: f64 = 0.05;

/// A condition on one of them needs this many diffusion times: it comes about half a one late.
const WATCHED_AFTER: f64 = 6.0;

/// And at least this many time constants: earlier, a hundredth more or less of its share shifts the time by
/// more than a twentieth.
const WATCHED_FROM: f64 = 0.2;

/// The layers around, at the moment a formula gives.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Around {
    /// Part of the heat that they hold.
    pub hold: f64,
    /// Sum of their diffusion times, s.
    pub lag: f64,
    /// The moment, s.
    pub time: f64,
    /// The moment in time constants of the decay.
    pub decays: f64,
    /// Is one of them watched?
    pub watched: bool,
}

impl Around {
    /// Says what speaks for and against the formula.
    pub fn judge(&self, verdict: &mut Verdict) {
        if self.hold <= 0.0 {
            return;
        }
        let words = format!("the layers around it hold {} of the heat", percent(self.hold));
        verdict.say(self.hold < HOLD_BELOW, words);
        let shift = self.hold * self.lag * self.decays / self.time;
        verdict.unless(shift < SHIFT_BELOW, || "the layers around follow too slowly".to_owned());
        let begin = 0.1 * self.hold / self.decays;
        let early = begin > BEGIN_BELOW || (self.watched && self.decays < WATCHED_FROM);
        verdict.unless(!early, || "so early it counts how the layers around begin".to_owned());
        let after = if self.watched { WATCHED_AFTER } else { SETTLED_AFTER };
        let counts = self.watched || self.hold > HARDLY_COUNTS * self.decays;
        verdict.unless(self.time > after * self.lag || !counts, || {
            "the layers around have not settled in by then".to_owned()
        });
        verdict.doubt(begin + shift);
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::scale::hand::Gives;

    /// A vessel of water in steel and wool, 4 % around, after a day.
    const VESSEL: Around = Around { hold: 0.04, lag: 13_000.0, time: 86_400.0, decays: 0.6, watched: false };

    fn holds(around: Around) -> bool {
        let mut verdict = Verdict::new();
        around.judge(&mut verdict);
        verdict.found("", "", Gives::Time(around.time)).result.holds
    }

    #[test]
    fn a_light_lagging_follows_and_a_heavy_one_does_not() {
        assert!(holds(VESSEL));
        assert!(holds(Around { watched: true, ..VESSEL }));
        assert!(!holds(Around { hold: 0.4, ..VESSEL }));
        assert!(!holds(Around { lag: 130_000.0, hold: 0.2, ..VESSEL }));
    }

    #[test]
    fn a_watched_face_needs_longer_than_the_contents() {
        let soon = Around { time: 30_000.0, decays: 0.2, hold: 0.009, ..VESSEL };
        assert!(holds(soon));
        assert!(!holds(Around { watched: true, ..soon }));
    }

    #[test]
    fn with_nothing_around_nothing_is_said() {
        let mut verdict = Verdict::new();
        Around { hold: 0.0, decays: 0.0, time: 0.0, ..VESSEL }.judge(&mut verdict);
        assert_eq!(verdict, Verdict::new());
    }
}
