//! What holds for every kind, system, number and text.

use super::Kind::*;
use super::System::{Metric, Us};
use super::*;
use proptest::prelude::*;

fn kinds() -> impl Strategy<Value = Kind> {
    prop::sample::select(Kind::ALL.to_vec())
}

fn systems() -> impl Strategy<Value = System> {
    prop::sample::select(vec![Metric, Us])
}

/// Numbers as a file holds them: short decimals, and any bits at all.
fn numbers() -> impl Strategy<Value = f64> {
    let decimals = (-999_999_i32..1_000_000, -8_i32..6)
        .prop_map(|(digits, power)| format!("{digits}e{power}").parse::<f64>().unwrap_or(0.0));
    prop_oneof![decimals, prop::num::f64::NORMAL | prop::num::f64::ZERO, -1e4..1e4]
}

/// Pieces of what people write, in any order.
fn scraps() -> impl Strategy<Value = String> {
    let scrap = prop::sample::select(vec![
        "1", "12", "200", "0", ",", ".", "..", "…", " ", "\u{a0}", "-", "−", "–", "+", "±", "+-", "+/-", "%",
        "(", ")", "to", "e", "e-3", "/", "½", "'", "\"", ":", "mm", "m", "°C", "F", "K", "W", "m²", "Btu",
        "h", "min", "^", "²", "é", "𝟘",
    ]);
    prop::collection::vec(scrap, 0..12).prop_map(|scraps| scraps.concat())
}

proptest! {
    #[test]
    fn what_is_written_reads_back_to_the_same_number(x in numbers(), kind in kinds(), system in systems()) {
        let text = write(x, None, None, kind, system);
        prop_assert_eq!(read(&text, kind, system), Ok(Written::plain(x)), "{}", text);
    }

    #[test]
    fn a_written_range_reads_back_to_the_same_numbers(
        mut ends in [numbers(), numbers(), numbers()],
        kind in kinds(),
        system in systems(),
    ) {
        ends.sort_by(f64::total_cmp);
        let [low, value, high] = ends.map(|x| x + 0.0);
        let text = write(value, Some(low), Some(high), kind, system);
        let expected = Written { value, low: Some(low), high: Some(high) };
        prop_assert_eq!(read(&text, kind, system), Ok(expected), "{}", text);
    }

    #[test]
    fn what_was_read_is_written_so_that_it_reads_the_same(text in scraps(), kind in kinds(), system in systems()) {
        if let Ok(written) = read(&text, kind, system) {
            let again = write(written.value, written.low, written.high, kind, system);
            let Written { value, low, high } = written;
            let expected = Written { value: value + 0.0, low: low.map(|x| x + 0.0), high: high.map(|x| x + 0.0) };
            prop_assert_eq!(read(&again, kind, system), Ok(expected), "{} -> {}", text, again);
        }
    }

    #[test]
    fn any_text_is_read_or_answered_with_one_line(text in "\\PC{0,24}", kind in kinds(), system in systems()) {
        match read(&text, kind, system) {
            Ok(written) => prop_assert!(written.value.is_finite()),
            Err(message) => prop_assert!(message.contains("for example") && !message.contains('\n')),
        }
    }

    #[test]
    fn a_step_of_any_text_can_be_read_again(
        text in scraps(), kind in kinds(), system in systems(), up: bool, large: bool,
    ) {
        if let Some(next) = step(&text, kind, system, up, large) {
            let (before, after) = (read(&text, kind, system).unwrap(), read(&next, kind, system).unwrap());
            prop_assert_eq!(after.value > before.value, up, "{} -> {}", text, next);
        }
    }

    #[test]
    fn short_numbers_of_a_unit_are_written_in_that_unit(digits in 1_i32..100_000, kind in kinds(), system in systems()) {
        let number = f64::from(digits) / 100.0;
        let typed = format!("{number} {}", unit(kind, system));
        if kind != Duration {
            let x = read(&typed, kind, system).unwrap().value;
            prop_assert_eq!(write(x, None, None, kind, system), typed.trim());
        }
    }
}
