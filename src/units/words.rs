//! Temperatures and lengths of time in words, rounded for reading.

use super::celsius;

const MINUTE: f64 = 60.0;
const HOUR: f64 = 3_600.0;
const DAY: f64 = 86_400.0;
/// Mean Gregorian year, 365.2425 days.
const YEAR: f64 = 365.2425 * DAY;

/// "63.2 °C", "60 °C", "−5 °C": to a tenth, a whole degree without its ".0".
///
/// # Units
/// K in, °C in the words.
pub fn temperature(kelvin: f64) -> String {
    if !kelvin.is_finite() {
        return "unknown".to_owned();
    }
    let tenths = (celsius(kelvin) * 10.0).round() / 10.0;
    format!("{} °C", number(tenths))
}

/// "45 s", "3 min 20 s", "8 h 20 min", "2 days 8 h", "23 days", "4.5 years": as finely as one would say it.
///
/// # Units
/// s
pub fn duration(seconds: f64) -> String {
    if seconds.is_nan() {
        return "unknown".to_owned();
    }
    if seconds.is_infinite() {
        return "without end".to_owned();
    }
    let said = positive_duration(seconds.abs());
    if seconds < 0.0 && said != "0 s" { format!("−{said}") } else { said }
}

fn positive_duration(s: f64) -> String {
    if s < 9.95 {
        let tenths = (s * 10.0).round() / 10.0;
        format!("{} s", number(tenths))
    } else if s < MINUTE - 0.5 {
        format!("{:.0} s", s.round())
    } else if s < 10.0 * MINUTE - 0.5 {
        in_two(s, 1.0, MINUTE, ["min", "min"], "s")
    } else if s < DAY - 0.5 * MINUTE {
        hours_and_minutes(s)
    } else if s < 10.0 * DAY - 0.5 * HOUR {
        in_two(s, HOUR, DAY, ["day", "days"], "h")
    } else if s < 2.0 * YEAR {
        format!("{:.0} days", (s / DAY).round())
    } else if s < 9.95 * YEAR {
        format!("{} years", number((s / YEAR * 10.0).round() / 10.0))
    } else if s < 1_000.0 * YEAR {
        format!("{:.0} years", (s / YEAR).round())
    } else {
        "over 1000 years".to_owned()
    }
}

fn hours_and_minutes(s: f64) -> String {
    let minutes = (s / MINUTE).round();
    if minutes < 60.0 { format!("{minutes:.0} min") } else { in_two(s, MINUTE, HOUR, ["h", "h"], "min") }
}

/// Whole `large` units (one, several) and the rest in whole `small` ones; no rest, no second word.
fn in_two(s: f64, small: f64, large: f64, large_names: [&str; 2], small_name: &str) -> String {
    let per_large = (large / small).round();
    let all_small = (s / small).round();
    let whole = (all_small / per_large).floor();
    let rest = all_small - whole * per_large;
    let large_name = if whole < 1.5 { large_names[0] } else { large_names[1] };
    if rest < 0.5 {
        format!("{whole:.0} {large_name}")
    } else {
        format!("{whole:.0} {large_name} {rest:.0} {small_name}")
    }
}

/// A number with the minus sign of print, no "-0".
pub(super) fn number(x: f64) -> String {
    if x == 0.0 {
        return "0".to_owned();
    }
    if x < 0.0 { format!("−{}", -x) } else { format!("{x}") }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::units::kelvin;

    #[test]
    fn temperatures_are_said_to_a_tenth() {
        assert_eq!(temperature(kelvin(63.2)), "63.2 °C");
        assert_eq!(temperature(kelvin(63.249)), "63.2 °C");
        assert_eq!(temperature(kelvin(60.0)), "60 °C");
        assert_eq!(temperature(kelvin(-5.0)), "−5 °C");
        assert_eq!(temperature(kelvin(-0.01)), "0 °C");
        assert_eq!(temperature(f64::NAN), "unknown");
    }

    #[test]
    fn durations_are_said_as_finely_as_one_would() {
        let said = [
            (0.0, "0 s"),
            (0.25, "0.3 s"),
            (45.0, "45 s"),
            (59.7, "1 min"),
            (200.0, "3 min 20 s"),
            (599.7, "10 min"),
            (2_700.0, "45 min"),
            (3_590.0, "1 h"),
            (30_000.0, "8 h 20 min"),
            (86_390.0, "1 day"),
            (115_200.0, "1 day 8 h"),
            (201_600.0, "2 days 8 h"),
            (2_000_000.0, "23 days"),
            (1.42e8, "4.5 years"),
            (1e9, "32 years"),
            (1e12, "over 1000 years"),
            (-30_000.0, "−8 h 20 min"),
            (f64::INFINITY, "without end"),
        ];
        for (seconds, words) in said {
            assert_eq!(duration(seconds), words);
        }
    }

    #[test]
    fn no_duration_says_sixty_minutes_or_twenty_four_hours() {
        for i in 0..400_000 {
            let said = duration(f64::from(i) * 3.7);
            assert!(!said.contains("60 s") && !said.contains("60 min") && !said.contains("24 h"), "{said}");
        }
    }
}
