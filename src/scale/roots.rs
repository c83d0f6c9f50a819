//! Where a rising function passes zero.

/// The place between `low` and `high` where `rises` passes from below zero to above, to the last bit.
///
/// Never asks at `low` or `high` themselves, so a function may be without value there. Where it does not pass
/// zero, the end nearest to it.
pub fn bisect(mut low: f64, mut high: f64, mut rises: impl FnMut(f64) -> f64) -> f64 {
    loop {
        let middle = low + 0.5 * (high - low);
        if middle <= low || middle >= high {
            return middle;
        }
        if rises(middle) < 0.0 {
            low = middle;
        } else {
            high = middle;
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn finds_the_root_to_the_last_bit_and_stays_within_its_ends() {
        assert_relative_eq!(bisect(0.0, 2.0, |x| x * x - 2.0), 2.0_f64.sqrt(), max_relative = 1e-15);
        assert_relative_eq!(bisect(1.0, 2.0, |x| x + 1.0), 1.0);
        assert_relative_eq!(bisect(1.0, 2.0, |x| x - 5.0), 2.0);
    }
}
