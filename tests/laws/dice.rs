//! Random choices that shrink towards the plainest one.

use proptest::collection::vec;
use proptest::strategy::Strategy;

/// More rolls than the largest scenario needs.
const ROLLS: usize = 250;

/// Numbers from 0 to 1 that decide everything; a roll of 0 is the plainest choice.
pub struct Dice<'a>(std::slice::Iter<'a, f64>);

/// Dice for one scenario.
pub fn dice() -> impl Strategy<Value = Vec<f64>> {
    vec(0.0..1.0, ROLLS)
}

impl<'a> Dice<'a> {
    /// Dice that fall as given, and on 0 after that.
    pub fn new(rolls: &'a [f64]) -> Self {
        Self(rolls.iter())
    }

    fn roll(&mut self) -> f64 {
        self.0.next().copied().unwrap_or(0.0)
    }

    /// Does something happen that happens in this share of cases?
    pub fn chance(&mut self, share: f64) -> bool {
        self.roll() > 1.0 - share
    }

    /// A number from 0 to `count - 1`.
    pub fn below(&mut self, count: u32) -> u32 {
        let rolled = self.roll();
        (0..count).rev().find(|&i| rolled * f64::from(count) >= f64::from(i)).unwrap_or(0)
    }

    /// A number between, evenly, with few digits.
    pub fn between(&mut self, low: f64, high: f64) -> f64 {
        few_digits(low + (high - low) * self.roll())
    }

    /// A number between, evenly in its logarithm, with few digits.
    pub fn scale(&mut self, low: f64, high: f64) -> f64 {
        few_digits(low * libm::pow(high / low, self.roll()))
    }
}

/// Four digits are enough to be random, and few enough to be read.
pub fn few_digits(x: f64) -> f64 {
    format!("{x:.3e}").parse().unwrap_or(x)
}
