//! Does a formula hold, and in which words.

use super::{Gives, HandResult};

/// A result that does not hold ranks behind all that do.
const BEHIND: f64 = 1e3;

/// A result without a time ranks behind those with one.
const WITHOUT_TIME: f64 = 1.0;

/// All that may be off, each small enough by itself, may add up to this part.
const TOGETHER_BELOW: f64 = 0.08;

/// A result with how far off it may be.
#[derive(Clone, Debug, PartialEq)]
pub struct Found {
    /// The result.
    pub result: HandResult,
    /// How far it may be off, roughly, as a part of the value.
    pub doubt: f64,
}

impl Found {
    /// The lower, the more fitting.
    pub fn rank(&self) -> f64 {
        let behind = if self.result.holds { 0.0 } else { BEHIND };
        let without = match self.result.gives {
            Gives::Temperature(_) => WITHOUT_TIME,
            Gives::Time(_) | Gives::Never { .. } => 0.0,
        };
        behind + without + self.doubt.min(0.5 * BEHIND)
    }
}

/// Does it hold? Collected point by point.
#[derive(Clone, Debug, PartialEq)]
pub struct Verdict {
    holds: bool,
    doubt: f64,
    words: Vec<String>,
}

impl Verdict {
    /// Nothing against it so far.
    pub fn new() -> Self {
        Self { holds: true, doubt: 0.0, words: Vec::new() }
    }

    /// A point that is said in any case.
    pub fn say(&mut self, holds: bool, words: String) {
        self.holds &= holds;
        self.words.push(words);
    }

    /// A point that is said only where it speaks against the formula.
    pub fn unless(&mut self, holds: bool, words: impl FnOnce() -> String) {
        if !holds {
            self.say(false, words());
        }
    }

    /// Something that is worth knowing and speaks against nothing.
    pub fn mention(&mut self, words: Option<String>) {
        self.words.extend(words);
    }

    /// Something that speaks against it, if there is something.
    pub fn object(&mut self, words: Option<String>) {
        self.holds &= words.is_none();
        self.words.extend(words);
    }

    /// It may be off by this part more.
    pub fn doubt(&mut self, part: f64) {
        self.doubt += part.max(0.0);
    }

    /// The result.
    pub fn found(mut self, name: &'static str, formula: &'static str, gives: Gives) -> Found {
        let too_much = self.holds && self.doubt > TOGETHER_BELOW;
        self.object(too_much.then(|| "each small, but together they count".to_owned()));
        let result = HandResult { name, formula, holds: self.holds, validity: self.words.join("; "), gives };
        Found { result, doubt: self.doubt }
    }
}

/// A pure number with two digits: "0.032", "15".
pub fn figure(x: f64) -> String {
    match x {
        x if !x.is_finite() => "without bound".to_owned(),
        x if x >= 10.0 => format!("{x:.0}"),
        x if x >= 1.0 => format!("{x:.1}"),
        x if x >= 0.1 => format!("{x:.2}"),
        x if x >= 0.01 => format!("{x:.3}"),
        x if x >= 0.001 => format!("{x:.4}"),
        _ => "under 0.001".to_owned(),
    }
}

/// A part of one in percent: "4 %".
pub fn percent(part: f64) -> String {
    if part < 0.01 { "under 1 %".to_owned() } else { format!("{:.0} %", 100.0 * part) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_carry_two_digits() {
        assert_eq!(figure(0.0317), "0.032");
        assert_eq!(figure(14.82), "15");
        assert_eq!(figure(3.43), "3.4");
        assert_eq!(figure(0.5), "0.50");
        assert_eq!(figure(1e-5), "under 0.001");
        assert_eq!(figure(f64::INFINITY), "without bound");
        assert_eq!(percent(0.036), "4 %");
    }

    #[test]
    fn one_objection_is_enough() {
        let mut verdict = Verdict::new();
        verdict.say(true, "Biot number 0.03, below 0.1".to_owned());
        verdict.unless(true, || "not said".to_owned());
        verdict.object(Some("surroundings change at 2 h: not counted".to_owned()));
        let found = verdict.found("steady", "", Gives::Time(1.0));
        assert!(!found.result.holds);
        assert_eq!(
            found.result.validity,
            "Biot number 0.03, below 0.1; surroundings change at 2 h: not counted"
        );
    }
}
