//! Numbers on axes and labels, and the steps of an axis.

/// To so many decimals, with the minus sign of print and no "−0".
pub fn fixed(value: f64, decimals: usize) -> String {
    if !value.is_finite() {
        return "–".to_owned();
    }
    let said = format!("{:.decimals$}", value.abs());
    let zero = said.bytes().all(|byte| matches!(byte, b'0' | b'.'));
    if value < 0.0 && !zero { format!("−{said}") } else { said }
}

/// A temperature as labels carry it: to a tenth.
pub fn tenths(value: f64) -> String {
    fixed(value, 1)
}

/// The ticks of an axis: where they stand and how many decimals tell them apart.
#[derive(Clone, Debug, PartialEq)]
pub struct Ticks {
    /// Ascending.
    pub at: Vec<f64>,
    /// Distance between them.
    pub step: f64,
    /// Decimals of their labels.
    pub decimals: usize,
}

impl Ticks {
    /// Round numbers from `low` to `high`, at most `most` (2 or more) of them where the range allows it: steps of
    /// 1, 2 or 5 times a power of ten.
    pub fn round(low: f64, high: f64, most: usize) -> Self {
        Self::apart(low, high, (high - low) / (most.max(2) - 1) as f64)
    }

    /// Round numbers from `low` to `high`, `least` or more apart.
    pub fn apart(low: f64, high: f64, least: f64) -> Self {
        let (step, decimals) = round_step(least);
        Self::multiples(low, high, step, decimals)
    }

    /// Multiples of `step` from `low` to `high`.
    pub fn multiples(low: f64, high: f64, step: f64, decimals: usize) -> Self {
        let (first, last) = ((low / step - 1e-9).ceil(), (high / step + 1e-9).floor());
        let mut at = Vec::new();
        let mut tick = first;
        while tick <= last && at.len() < MOST_TICKS {
            at.push(tick * step);
            tick += 1.0;
        }
        Self { at, step, decimals }
    }

    /// The label of a tick.
    pub fn label(&self, tick: f64) -> String {
        fixed(tick, self.decimals)
    }
}

/// No picture has room for more.
const MOST_TICKS: usize = 60;

/// The least of 1, 2, 5 times a power of ten that is not below `least`, and the decimals it needs.
fn round_step(least: f64) -> (f64, usize) {
    if !(least.is_finite() && least > 1e-12) {
        return (1.0, 0);
    }
    let mut power = 1e-12;
    let mut decimals = 12_usize;
    loop {
        for factor in [1.0, 2.0, 5.0] {
            if factor * power >= least * (1.0 - 1e-9) {
                return (factor * power, decimals);
            }
        }
        decimals = decimals.saturating_sub(1);
        power = if decimals > 0 { POWERS[decimals] } else { power.max(0.1) * 10.0 };
    }
}

/// 10 to the minus its index, each the nearest number to it.
const POWERS: [f64; 13] = [1.0, 1e-1, 1e-2, 1e-3, 1e-4, 1e-5, 1e-6, 1e-7, 1e-8, 1e-9, 1e-10, 1e-11, 1e-12];

/// Least and greatest of what is finite, widened by `pad` of the difference on both sides and to at least `least`.
pub fn span(values: impl Iterator<Item = f64>, pad: f64, least: f64) -> (f64, f64) {
    let (low, high) = values
        .filter(|value| value.is_finite())
        .fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), value| (low.min(value), high.max(value)));
    if low > high {
        return (0.0, least.max(1.0));
    }
    let widen = (pad * (high - low)).max(0.5 * (least - (high - low)));
    (low - widen, high + widen)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn numbers_carry_the_minus_of_print_and_no_minus_zero() {
        assert_eq!([tenths(63.24), tenths(-5.0), tenths(-0.01)], ["63.2", "−5.0", "0.0"]);
        assert_eq!(fixed(f64::NAN, 1), "–");
    }

    #[test]
    fn ticks_are_round_and_no_more_than_asked() {
        let said = |low, high, most| {
            let ticks = Ticks::round(low, high, most);
            ticks.at.iter().map(|tick| ticks.label(*tick)).collect::<Vec<_>>()
        };
        assert_eq!(said(12.0, 93.0, 6), ["20", "40", "60", "80"]);
        assert_eq!(said(-7.0, 7.0, 4), ["−5", "0", "5"]);
        assert_eq!(said(59.95, 60.25, 4), ["60.0", "60.1", "60.2"]);
        assert_eq!(said(0.0, 3000.0, 4), ["0", "1000", "2000", "3000"]);
        for most in 2..12 {
            for i in 1..200 {
                let high = f64::from(i) * 0.37;
                assert!(Ticks::round(0.0, high, most).at.len() <= most, "{high} with {most}");
            }
        }
    }

    #[test]
    fn a_span_ignores_what_is_no_number() {
        assert_eq!(span([1.0, f64::NAN, 3.0].into_iter(), 0.1, 0.0), (0.8, 3.2));
        assert_eq!(span([5.0].into_iter(), 0.1, 2.0), (4.0, 6.0));
        assert_eq!(span(std::iter::empty(), 0.1, 2.0), (0.0, 2.0));
    }
}
