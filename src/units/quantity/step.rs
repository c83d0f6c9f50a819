//! What the arrow keys do to a written quantity: a sensible step, its unit and style kept.

use super::number::Numeral;
use super::phrase::{Amount, Known, Phrase, phrase};
use super::read::plain_characters;
use super::unit::Unit;
use super::{Kind, System, read, unit, write};

/// A large step is so many steps.
const LARGE: i64 = 5;
/// Numbers of more digits are not stepped.
const MOST_DIGITS: usize = 15;

/// The text one step up or down; none where it cannot be read or the step leaves what the kind can be.
///
/// A step is one unit of the second digit (400 to 410) or of the last written digit where that is larger (8 to
/// 9, 0.04 to 0.05), for a temperature always of the last written digit; `large` is five of them. It lands on
/// round numbers. Of a range both ends move, of `8 (6 to 12)` all three, of `8 ± 2` the 8. Times in parts move
/// by their last part; other lengths in parts, fractions and grouped thousands are written as decimals first.
pub fn step(text: &str, kind: Kind, system: System, up: bool, large: bool) -> Option<String> {
    let chars = plain_characters(text).ok()?;
    let phrase = phrase(&chars, kind).ok()?;
    let written = read(text, kind, system).ok()?;
    if let Some(numerals) = plain_numerals(&phrase) {
        let change = Change::of(numerals[0], kind, up, large)?;
        let new = change.applied(text, numerals)?;
        return is_possible(&new, kind, system).then_some(new);
    }
    if kind == Kind::Duration {
        return time_in_parts(&phrase, written.value, up, large);
    }
    let as_decimals = write(written.value, written.low, written.high, kind, system);
    if as_decimals == text { None } else { step(&as_decimals, kind, system, up, large) }
}

/// The amounts that move together, the leading one first.
fn moving(phrase: &Phrase) -> Vec<&Amount> {
    match &phrase.known {
        Known::Exactly | Known::Within(_) | Known::WithinPercent(_) => vec![&phrase.amount],
        Known::UpTo(high) => vec![&phrase.amount, high],
        Known::Between(low, high) => vec![&phrase.amount, low, high],
    }
}

/// Their numbers, if each is one plain number.
fn plain_numerals(phrase: &Phrase) -> Option<Vec<&Numeral>> {
    let numeral = |amount: &'_ Amount| amount.parts.len() == 1 && amount.parts[0].numeral.plain;
    let amounts = moving(phrase);
    let all_plain = amounts.iter().all(|amount| numeral(amount));
    all_plain.then(|| amounts.iter().map(|amount| &amount.parts[0].numeral).collect())
}

/// Does the text still say what its kind can be?
fn is_possible(text: &str, kind: Kind, system: System) -> bool {
    let Ok(written) = read(text, kind, system) else { return false };
    let above_zero = written.value > 0.0 || (written.value >= 0.0 && !kind.excludes_zero());
    let above_zero = above_zero || !kind.starts_at_zero();
    above_zero && (kind != Kind::Emissivity || written.value <= 1.0)
}

/// By how much numbers change: so many units of a decimal place.
struct Change {
    units: i64,
    decimals: usize,
    comma: bool,
}

impl Change {
    /// The change that a step means for the leading number.
    fn of(leading: &Numeral, kind: Kind, up: bool, large: bool) -> Option<Self> {
        let number = digits(leading)?;
        let size = number.unsigned_abs().to_string();
        let shrinks = up == (number < 0);
        // From 100 down to 99, as from 99 up to 100.
        let first_of_its_length = shrinks && size.starts_with('1') && size[1..].chars().all(|c| c == '0');
        let places = if kind == Kind::Temperature {
            0
        } else {
            size.len().saturating_sub(2 + usize::from(first_of_its_length))
        };
        let step = power_of_ten(places)?.checked_mul(if large { LARGE } else { 1 })?;
        let next =
            if up { (number.div_euclid(step) + 1) * step } else { -((-number).div_euclid(step) + 1) * step };
        Some(Self { units: next - number, decimals: leading.decimals, comma: leading.comma })
    }

    /// The text with its numbers changed.
    fn applied(&self, text: &str, mut numerals: Vec<&Numeral>) -> Option<String> {
        numerals.sort_by_key(|numeral| numeral.span.start);
        let chars: Vec<char> = text.chars().collect();
        let mut out = String::new();
        let mut at = 0;
        for numeral in numerals {
            out.extend(&chars[at..numeral.span.start]);
            out.push_str(&self.changed(numeral)?);
            at = numeral.span.end;
        }
        out.extend(&chars[at..]);
        Some(out)
    }

    fn changed(&self, numeral: &Numeral) -> Option<String> {
        let decimals = numeral.decimals.max(self.decimals);
        let own = digits(numeral)?.checked_mul(power_of_ten(decimals - numeral.decimals)?)?;
        let change = self.units.checked_mul(power_of_ten(decimals - self.decimals)?)?;
        let sum = own.checked_add(change)?;
        let all = format!("{:0>1$}", sum.unsigned_abs(), decimals + 1);
        let (whole, after) = all.split_at(all.len() - decimals);
        let mark = match (decimals, numeral.comma || self.comma) {
            (0, _) => "",
            (_, true) => ",",
            (_, false) => ".",
        };
        let sign = if sum < 0 { "−" } else { "" };
        Some(format!("{sign}{whole}{mark}{after}"))
    }
}

/// The number in units of its last digit.
fn digits(numeral: &Numeral) -> Option<i64> {
    let text = format!("{:.*}", numeral.decimals, numeral.value).replace('.', "");
    if text.len() > MOST_DIGITS { None } else { text.parse().ok() }
}

fn power_of_ten(places: usize) -> Option<i64> {
    10_i64.checked_pow(u32::try_from(places).ok()?)
}

/// `2 h 30 min` to `2 h 31 min`, large to `2 h 35 min`.
fn time_in_parts(phrase: &Phrase, seconds: f64, up: bool, large: bool) -> Option<String> {
    let [amount] = moving(phrase)[..] else { return None };
    let last = amount.parts.last()?.unit.as_deref();
    let size = Unit::parse(last.unwrap_or(unit(Kind::Duration, System::Metric)))?.size();
    let step = if large { size * 5.0 } else { size };
    let next = if up { (seconds / step).floor() + 1.0 } else { (seconds / step).ceil() - 1.0 };
    (next >= 0.0).then(|| write(next * step, None, None, Kind::Duration, System::Metric))
}

#[cfg(test)]
mod tests {
    use super::Kind::*;
    use super::System::{Metric, Us};
    use super::*;

    fn up(text: &str, kind: Kind) -> Option<String> {
        step(text, kind, Metric, true, false)
    }

    fn down(text: &str, kind: Kind) -> Option<String> {
        step(text, kind, Metric, false, false)
    }

    #[test]
    fn a_step_is_sensible_and_keeps_unit_and_style() {
        let steps = [
            ("400 mm", Length, "410 mm"),
            ("403 mm", Length, "410 mm"),
            ("0,4 m", Length, "0,5 m"),
            ("0.40 m", Length, "0.41 m"),
            ("8", Film, "9"),
            ("18 °C", Temperature, "19 °C"),
            ("  18.5C", Temperature, "  18.6C"),
            ("−5 °C", Temperature, "−4 °C"),
            ("-1", Temperature, "0"),
            ("7850", Density, "7900"),
            ("0.04 W/mK", Conductivity, "0.05 W/mK"),
            ("0.9", Emissivity, "1.0"),
            ("6 to 12 W/m²K", Film, "7 to 13 W/m²K"),
            ("6 – 12", Film, "7 – 13"),
            ("0.25 to 0.3", Emissivity, "0.26 to 0.31"),
            ("8 (6 to 12) W/m²K", Film, "9 (7 to 13) W/m²K"),
            ("8 ± 2 W/m²K", Film, "9 ± 2 W/m²K"),
            ("8 ± 25 %", Film, "9 ± 25 %"),
            ("2 h", Duration, "3 h"),
            ("2 h 30 min", Duration, "2 h 31 min"),
            ("23:59", Duration, "1 d"),
            ("1 200 mm", Length, "1300 mm"),
            ("1/2 in", Length, "13.0 mm"),
        ];
        for (text, kind, expected) in steps {
            assert_eq!(up(text, kind).as_deref(), Some(expected), "{text}");
        }
        assert_eq!(step("3 1/2 in", Length, Us, true, false).as_deref(), Some("3.6 in"));
    }

    #[test]
    fn a_large_step_is_five_and_lands_on_round_numbers() {
        let large = |text, kind, up| step(text, kind, Metric, up, true);
        assert_eq!(large("400 mm", Length, true).as_deref(), Some("450 mm"));
        assert_eq!(large("18 °C", Temperature, true).as_deref(), Some("20 °C"));
        assert_eq!(large("−3 °C", Temperature, false).as_deref(), Some("−5 °C"));
        assert_eq!(large("2 h 31 min", Duration, true).as_deref(), Some("2 h 35 min"));
    }

    #[test]
    fn down_undoes_up() {
        for (text, kind) in [
            ("99", Film),
            ("990 mm", Length),
            ("0.9", Emissivity),
            ("−1 °C", Temperature),
            ("6 to 12", Film),
            ("9.9 W/m²K", Film),
            ("2 h 29 min", Duration),
        ] {
            let there = up(text, kind).expect(text);
            assert_eq!(down(&there, kind).as_deref(), Some(text), "{there}");
        }
    }

    #[test]
    fn no_step_leaves_what_the_kind_can_be() {
        assert_eq!(down("1 mm", Length), None);
        assert_eq!(down("0 W/m²K", Film), None);
        assert_eq!(up("1", Emissivity), None);
        assert_eq!(down("0 min", Duration), None);
        assert_eq!(up("thick", Length), None);
        assert_eq!(down("0 °C", Temperature).as_deref(), Some("−1 °C"));
        assert_eq!(down("0", HeatFlux).as_deref(), Some("−1"));
    }
}
