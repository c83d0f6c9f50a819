//! Heat stored in nodes whose heat capacity depends on temperature.

use crate::matter::Law;

/// A node whose heat capacity is not the same at every temperature.
#[derive(Clone, Debug)]
pub struct VaryingNode<'a> {
    /// The node.
    pub node: usize,
    /// Its volumes, each with its capacity per volume.
    pub parts: Vec<(f64, &'a Law)>,
}

/// Newton steps after which the bracket alone decides; each halves it at least.
const ITERATIONS: usize = 80;

impl VaryingNode<'_> {
    /// Heat stored against a fixed reference, J.
    pub fn heat(&self, temperature: f64) -> f64 {
        self.parts.iter().map(|(volume, law)| volume * law.integral(temperature)).sum()
    }

    /// Heat capacity, J/K.
    pub fn capacity(&self, temperature: f64) -> f64 {
        self.parts.iter().map(|(volume, law)| volume * law.value(temperature)).sum()
    }

    /// The temperature at which this much heat is stored, K: Newton within a bracket, from a near guess.
    pub fn temperature(&self, heat: f64, guess: f64) -> f64 {
        let mut at = guess;
        let (mut low, mut high) = (f64::NEG_INFINITY, f64::INFINITY);
        for _ in 0..ITERATIONS {
            let over = self.heat(at) - heat;
            if over > 0.0 {
                high = at;
            } else {
                low = at;
            }
            let mut next = at - over / self.capacity(at);
            // Rounding of a temperature of some hundred kelvin.
            if (next - at).abs() <= 1e-13 * at.abs() {
                return next;
            }
            if !(next > low && next < high) {
                next = 0.5 * (low + high);
            }
            at = next;
        }
        at
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_temperature_of_the_heat_of_a_temperature_is_that_temperature() {
        let peak = Law::table(&[(300.0, 500.0), (900.0, 900.0), (1008.0, 5000.0), (1010.0, 600.0)]);
        let flat = Law::Constant(2.0e6);
        let node = VaryingNode { node: 0, parts: vec![(0.3, &peak), (1e-5, &flat)] };
        for i in 0..200 {
            let at = 200.0 + 5.0 * f64::from(i);
            let back = node.temperature(node.heat(at), 300.0 + f64::from(i * 37 % 800));
            assert!((back - at).abs() < 1e-9, "{at}: {back}");
        }
    }
}
