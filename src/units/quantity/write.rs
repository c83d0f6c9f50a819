//! From a number in the unit of the file to the shortest text that reads back to the same number.

use super::read::middle;
use super::unit::Unit;
use super::{Kind, System, unit};

/// So many digits tell any two numbers apart.
const ALL_DIGITS: usize = 17;
/// So many are shown where a text need not read back.
const SHOWN_DIGITS: usize = 4;
/// Times up to this are told apart to the second and written in parts, s.
const LONGEST_IN_PARTS: f64 = 1e12;

/// The shortest text in the shown unit that [`read`](super::read()) reads back to exactly the same numbers:
/// "400 mm", "6 to 12 W/m²K" where the value is the middle, else "8 (6 to 12) W/m²K".
///
/// Where no number in that unit does so, as happens with more than 14 digits, the unit of the file is used.
/// Numbers that are not finite give an empty text.
pub fn write(value: f64, low: Option<f64>, high: Option<f64>, kind: Kind, system: System) -> String {
    let Some(numbers) = in_order(value, low, high) else { return String::new() };
    if kind == Kind::Duration {
        return times(&numbers);
    }
    let units = [unit(kind, system), kind.file_unit()];
    units.iter().find_map(|unit| exactly(&numbers, kind, unit)).unwrap_or_default()
}

/// The same, rounded for showing: "17.78 °C", "15.75 in". It may read back to slightly other numbers.
pub fn show(value: f64, low: Option<f64>, high: Option<f64>, kind: Kind, system: System) -> String {
    let Some(numbers) = in_order(value, low, high) else { return String::new() };
    if kind == Kind::Duration {
        let seconds: Vec<f64> = numbers.iter().map(|x| if x.abs() < 10.0 { *x } else { x.round() }).collect();
        return times(&seconds);
    }
    let shown = unit(kind, system);
    let Some(unit) = Unit::parse(shown) else { return String::new() };
    let rounded = |&x: &f64| number_text(digits(kind.in_unit(x, &unit), SHOWN_DIGITS));
    arranged(&numbers.iter().map(rounded).collect::<Vec<_>>(), shown)
}

/// The numbers as they are written: the value; low and high; or value, low, high.
fn in_order(value: f64, low: Option<f64>, high: Option<f64>) -> Option<Vec<f64>> {
    let numbers = if low.is_none() && high.is_none() {
        vec![value]
    } else {
        let (low, high) = (low.unwrap_or(value), high.unwrap_or(value));
        if middle(low, high).to_bits() == value.to_bits() { vec![low, high] } else { vec![value, low, high] }
    };
    numbers.iter().all(|number| number.is_finite()).then_some(numbers)
}

fn arranged(texts: &[String], unit: &str) -> String {
    let numbers = match texts {
        [low, high] => format!("{low} to {high}"),
        [value, low, high] => format!("{value} ({low} to {high})"),
        other => other.concat(),
    };
    format!("{numbers} {unit}").trim_end().to_owned()
}

/// All numbers in one unit, if they read back.
fn exactly(numbers: &[f64], kind: Kind, unit: &str) -> Option<String> {
    let parsed = Unit::parse(unit)?;
    let texts: Option<Vec<String>> =
        numbers.iter().map(|&x| exact_number(x, kind, &parsed).map(number_text)).collect();
    Some(arranged(&texts?, unit))
}

/// The number with the fewest digits that becomes `x` in the unit of the file.
fn exact_number(x: f64, kind: Kind, unit: &Unit) -> Option<f64> {
    // Without the sign of a negative zero.
    let x = x + 0.0;
    let near = kind.in_unit(x, unit);
    let candidates = (1..=ALL_DIGITS).map(|count| digits(near, count) + 0.0);
    candidates.into_iter().find(|&candidate| kind.to_file(candidate, unit).to_bits() == x.to_bits())
}

fn digits(x: f64, count: usize) -> f64 {
    format!("{x:.*e}", count - 1).parse().unwrap_or(x)
}

/// As one writes a number: a true minus sign; powers of ten only for the very small and the very large.
pub(super) fn number_text(x: f64) -> String {
    let size = x.abs();
    let text =
        if size != 0.0 && !(1e-4..1e9).contains(&size) { format!("{size:e}") } else { size.to_string() };
    if x < 0.0 { format!("−{text}") } else { text }
}

fn times(numbers: &[f64]) -> String {
    if let [seconds] = numbers {
        return if *seconds < 0.0 { format!("−{}", time(-seconds)) } else { time(*seconds) };
    }
    let short = |unit: &&str| exactly(numbers, Kind::Duration, unit).filter(|text| has_few_decimals(text));
    let text = ["h", "min"].iter().find_map(short);
    text.or_else(|| exactly(numbers, Kind::Duration, "s")).unwrap_or_default()
}

/// "1 d 4 h", "2 h 30 min", "45 s", "0.5 s"
fn time(seconds: f64) -> String {
    if seconds > LONGEST_IN_PARTS || seconds.fract() > 0.0 {
        return format!("{} s", number_text(seconds));
    }
    let mut rest = seconds;
    let mut parts = Vec::new();
    for (unit, size) in [("d", 86_400.0), ("h", 3_600.0), ("min", 60.0), ("s", 1.0)] {
        let count = (rest / size).floor();
        rest -= count * size;
        if count > 0.0 {
            parts.push(format!("{count} {unit}"));
        }
    }
    if parts.is_empty() { "0 h".to_owned() } else { parts.join(" ") }
}

/// At most two digits behind each point?
fn has_few_decimals(text: &str) -> bool {
    text.split('.').skip(1).all(|after| after.chars().take_while(char::is_ascii_digit).count() <= 2)
}

#[cfg(test)]
mod tests {
    use super::super::{Written, read};
    use super::Kind::*;
    use super::System::{Metric, Us};
    use super::*;

    fn plain(value: f64, kind: Kind, system: System) -> String {
        write(value, None, None, kind, system)
    }

    #[test]
    fn the_shortest_text_is_written() {
        assert_eq!(plain(0.4, Length, Metric), "400 mm");
        assert_eq!(plain(0.3, Length, Metric), "300 mm");
        assert_eq!(plain(0.1 + 0.2, Length, Metric), "0.30000000000000004 m");
        assert_eq!(plain(0.0762, Length, Us), "3 in");
        assert_eq!(plain(-5.0, Temperature, Metric), "−5 °C");
        assert_eq!(plain(-0.0, Temperature, Metric), "0 °C");
        assert_eq!(plain(40.0, Temperature, Us), "104 °F");
        assert_eq!(plain(5.0, TemperatureDifference, Us), "9 °F");
        assert_eq!(plain(4_186.8, HeatCapacity, Us), "1 Btu/lb °F");
        assert_eq!(plain(5e-5, Contact, Metric), "5e-5 m²K/W");
        assert_eq!(plain(0.25, Emissivity, Us), "0.25");
        assert_eq!(plain(f64::NAN, Length, Metric), "");
    }

    #[test]
    fn a_range_is_written_as_ends_and_where_needed_with_its_value() {
        assert_eq!(write(9.0, Some(6.0), Some(12.0), Film, Metric), "6 to 12 W/m²K");
        assert_eq!(write(8.0, Some(6.0), Some(12.0), Film, Metric), "8 (6 to 12) W/m²K");
        assert_eq!(write(0.3, Some(0.1), Some(0.5), Emissivity, Metric), "0.1 to 0.5");
        assert_eq!(write(8.0, None, Some(12.0), Film, Metric), "8 (8 to 12) W/m²K");
        assert_eq!(write(9_000.0, Some(7_200.0), Some(10_800.0), Duration, Metric), "2 to 3 h");
        assert_eq!(write(50.0, Some(45.0), Some(60.0), Duration, Us), "50 (45 to 60) s");
    }

    #[test]
    fn times_are_written_in_parts() {
        let written = [
            (0.0, "0 h"),
            (0.5, "0.5 s"),
            (45.0, "45 s"),
            (5_400.0, "1 h 30 min"),
            (100_800.0, "1 d 4 h"),
            (86_401.0, "1 d 1 s"),
            (-9_000.0, "−2 h 30 min"),
            (90.0 * 86_400.0, "90 d"),
        ];
        for (seconds, text) in written {
            assert_eq!(plain(seconds, Duration, Metric), text);
            assert_eq!(read(text, Duration, Us), Ok(Written::plain(seconds)));
        }
    }

    #[test]
    fn what_is_shown_is_rounded() {
        assert_eq!(show(17.777_777_777_778, None, None, Temperature, Metric), "17.78 °C");
        assert_eq!(show(0.4, None, None, Length, Us), "15.75 in");
        assert_eq!(show(0.04, Some(0.035), Some(0.045), Conductivity, Us), "0.02022 to 0.026 Btu/h ft °F");
        assert_eq!(show(5_400.4, None, None, Duration, Metric), "1 h 30 min");
    }
}
