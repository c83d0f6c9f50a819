//! Numbers as people write them: decimal point or comma, thousands, powers of ten, fractions.

use std::ops::Range;

/// A number and how it was written.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Numeral {
    pub(super) value: f64,
    pub(super) negative: bool,
    /// Where it stands, in characters, with its sign.
    pub(super) span: Range<usize>,
    /// Digits after the decimal mark.
    pub(super) decimals: usize,
    /// Is the decimal mark a comma?
    pub(super) comma: bool,
    /// Nothing but digits and one decimal mark?
    pub(super) plain: bool,
}

const FRACTIONS: &[(char, f64)] =
    &[('½', 0.5), ('¼', 0.25), ('¾', 0.75), ('⅛', 0.125), ('⅜', 0.375), ('⅝', 0.625), ('⅞', 0.875)];

/// A character as the readers of this room know it: one space, one hyphen, one stroke, one prime of each kind.
pub(super) fn plain_character(c: char) -> char {
    match c {
        '\u{200b}' | '\u{2060}' | '\u{feff}' => ' ',
        c if c.is_whitespace() => ' ',
        '\u{2010}'..='\u{2015}' | '\u{2212}' | '\u{fe63}' | '\u{ff0d}' => '-',
        '\u{2019}' | '\u{2018}' | '\u{2032}' | '\u{b4}' => '\'',
        '\u{2033}' | '\u{201d}' | '\u{201c}' | '\u{201e}' => '"',
        '\u{3bc}' => 'µ',
        '\u{ba}' | '\u{2da}' => '°',
        '\u{2044}' | '\u{2215}' => '/',
        '\u{d7}' | '\u{22c5}' | '\u{2219}' => '·',
        c => c,
    }
}

/// The number that begins at a place, if one does.
///
/// # Errors
/// What is wrong with a number that begins there, as a sentence without full stop.
pub(super) fn numeral(chars: &[char], at: usize) -> Result<Option<Numeral>, String> {
    let negative = chars.get(at) == Some(&'-');
    let mut begin = at + usize::from(negative || chars.get(at) == Some(&'+'));
    while begin > at && chars.get(begin) == Some(&' ') {
        begin += 1;
    }
    let end = digits_end(chars, begin);
    let found = if end == begin {
        vulgar(chars, begin).map(|(value, end)| whole_or_fraction(value, end))
    } else {
        Some(Found::new(chars, begin, end)?)
    };
    let Some(found) = found else { return Ok(None) };
    let value = if negative { -found.value } else { found.value };
    if !value.is_finite() {
        return Err(format!("{} is too large", quoted(&chars[at..found.end])));
    }
    let Found { end, decimals, comma, plain, .. } = found;
    Ok(Some(Numeral { value, negative, span: at..end, decimals, comma, plain }))
}

/// Characters in quotation marks, shortened.
pub(super) fn quoted(chars: &[char]) -> String {
    const LONGEST: usize = 30;
    let text: String = chars.iter().take(LONGEST).collect();
    let more = if chars.len() > LONGEST { "…" } else { "" };
    format!("\"{}{more}\"", text.trim())
}

/// A number without its sign.
struct Found {
    value: f64,
    end: usize,
    decimals: usize,
    comma: bool,
    plain: bool,
}

fn whole_or_fraction(value: f64, end: usize) -> Found {
    Found { value, end, decimals: 0, comma: false, plain: false }
}

impl Found {
    fn new(chars: &[char], begin: usize, end: usize) -> Result<Self, String> {
        let run = &chars[begin..end];
        if run.iter().all(char::is_ascii_digit)
            && let Some((value, end)) = fraction(chars, begin, end)?
        {
            return Ok(whole_or_fraction(value, end));
        }
        let (digits, decimals, comma) = marks(run)?;
        let (power, after) = exponent(chars, end);
        let value = format!("{digits}e{power}").parse().unwrap_or(f64::INFINITY);
        let plain =
            after == end && run.iter().filter(|c| !c.is_ascii_digit()).count() == usize::from(decimals > 0);
        Ok(Self { value, end: after, decimals, comma, plain })
    }
}

/// Where the digits end that begin at a place, with the marks, spaces and primes that stand between them.
fn digits_end(chars: &[char], begin: usize) -> usize {
    let digit = |i: usize| chars.get(i).is_some_and(char::is_ascii_digit);
    let three_follow = |at: usize| (1..=3).all(|i| digit(at + i)) && !digit(at + 4);
    let mut at = begin;
    let mut group = 0;
    let mut may_group = true;
    loop {
        match chars.get(at) {
            Some('0'..='9') => {
                group += 1;
                may_group &= group <= 3;
            }
            Some(' ' | '\'') if may_group && group > 0 && three_follow(at) => group = 0,
            Some('.' | ',') if digit(at + 1) => may_group = false,
            // `5.` while somebody types on; `6..12` is a range.
            Some('.' | ',') if group > 0 && !matches!(chars.get(at + 1), Some('.' | ',')) => return at + 1,
            _ => return at,
        }
        at += 1;
    }
}

/// The digits with a decimal point, how many follow it, and whether it was a comma.
fn marks(run: &[char]) -> Result<(String, usize, bool), String> {
    let count = |mark: char| run.iter().filter(|&&c| c == mark).count();
    let (points, commas) = (count('.'), count(','));
    let last = run.iter().rposition(|c| matches!(c, '.' | ','));
    let decimal = match (points, commas) {
        (1, 0) => last,
        (0, 1) => {
            refuse_ambiguous_comma(run)?;
            last
        }
        (0, _) | (_, 0) => None,
        _ if last.is_some_and(|at| count(run[at]) == 1) => last,
        _ => return Err(format!("{} has its decimal mark twice", quoted(run))),
    };
    let whole = &run[..decimal.unwrap_or(run.len())];
    let groups: Vec<&[char]> = whole.split(|c| !c.is_ascii_digit()).collect();
    if groups.len() > 1
        && (groups[0].is_empty() || groups[0].len() > 3 || groups[1..].iter().any(|g| g.len() != 3))
    {
        return Err(format!("{} does not group its thousands in threes", quoted(run)));
    }
    let after: String = decimal.map_or(String::new(), |at| run[at + 1..].iter().collect());
    let whole: String = groups.concat().into_iter().collect();
    let comma = decimal.is_some_and(|at| run[at] == ',');
    Ok((format!("0{whole}.{after}"), after.len(), comma))
}

/// `1,200` may be 1.2 or 1200; `0,125`, `12,5` and `1 200,500` may not.
fn refuse_ambiguous_comma(run: &[char]) -> Result<(), String> {
    let comma = run.iter().position(|&c| c == ',').unwrap_or(0);
    let (before, after) = (&run[..comma], &run[comma + 1..]);
    let may_be_thousands = after.len() == 3
        && (1..=3).contains(&before.len())
        && before[0] != '0'
        && before.iter().all(char::is_ascii_digit);
    if !may_be_thousands {
        return Ok(());
    }
    let (before, after): (String, String) = (before.iter().collect(), after.iter().collect());
    Err(format!("\"{before},{after}\" can be {before}.{after} or {before}{after}; write one of these"))
}

/// The power of ten that stands at a place, and the place after it.
fn exponent(chars: &[char], at: usize) -> (i32, usize) {
    let none = (0, at);
    if !matches!(chars.get(at), Some('e' | 'E')) {
        return none;
    }
    let sign = usize::from(matches!(chars.get(at + 1), Some('-' | '+')));
    let begin = at + 1 + sign;
    let digits: String = chars[begin.min(chars.len())..].iter().take_while(|c| c.is_ascii_digit()).collect();
    if digits.is_empty() {
        return none;
    }
    let power = digits.parse().unwrap_or(9_999).min(9_999);
    (if chars[at + 1] == '-' { -power } else { power }, begin + digits.len())
}

/// `1/2`, `3 1/2`, `3-1/2`, `3½` behind whole digits.
fn fraction(chars: &[char], begin: usize, end: usize) -> Result<Option<(f64, usize)>, String> {
    let whole = integer(&chars[begin..end]);
    if chars.get(end) == Some(&'/') {
        return divided(chars, begin, whole, end);
    }
    let spaces = chars[end..].iter().take_while(|&&c| c == ' ').count();
    let hyphen = usize::from(spaces == 0 && whole > 0.0 && chars.get(end) == Some(&'-'));
    let next = end + spaces + hyphen;
    if let Some((part, after)) = vulgar(chars, next) {
        return Ok(Some((whole + part, after)));
    }
    let digits = chars[next..].iter().take_while(|c| c.is_ascii_digit()).count();
    if next == end || digits == 0 || chars.get(next + digits) != Some(&'/') {
        return Ok(None);
    }
    let part = divided(chars, next, integer(&chars[next..next + digits]), next + digits)?;
    // A range that runs down, as in `2-3/2`, is no fraction.
    Ok(part.filter(|(part, _)| *part < 1.0).map(|(part, after)| (whole + part, after)))
}

/// The quotient whose stroke stands at a place, if digits follow it.
fn divided(chars: &[char], begin: usize, above: f64, stroke: usize) -> Result<Option<(f64, usize)>, String> {
    let digits = chars[stroke + 1..].iter().take_while(|c| c.is_ascii_digit()).count();
    if digits == 0 {
        return Ok(None);
    }
    let end = stroke + 1 + digits;
    let below = integer(&chars[stroke + 1..end]);
    if below == 0.0 {
        return Err(format!("{} divides by zero", quoted(&chars[begin..end])));
    }
    Ok(Some((above / below, end)))
}

fn vulgar(chars: &[char], at: usize) -> Option<(f64, usize)> {
    let c = chars.get(at)?;
    FRACTIONS.iter().find(|(sign, _)| sign == c).map(|(_, value)| (*value, at + 1))
}

fn integer(digits: &[char]) -> f64 {
    digits.iter().collect::<String>().parse().unwrap_or(f64::INFINITY)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn value(text: &str) -> Option<f64> {
        let chars: Vec<char> = text.chars().map(plain_character).collect();
        let found = numeral(&chars, 0).ok()??;
        (found.span.end == chars.len()).then_some(found.value)
    }

    #[test]
    fn points_and_commas_are_read_by_the_rule() {
        let read = [
            ("0.4", 0.4),
            ("0,4", 0.4),
            (",5", 0.5),
            ("1.200", 1.2),
            ("0,125", 0.125),
            ("1234,567", 1234.567),
            ("1,200.5", 1200.5),
            ("1.200,5", 1200.5),
            ("1,200,000", 1_200_000.0),
            ("1.200.000", 1_200_000.0),
            ("1 200", 1200.0),
            ("12\u{202f}345\u{a0}678,9", 12_345_678.9),
            ("1 200,500", 1200.5),
            ("1e-3", 0.001),
            ("2.5E3", 2500.0),
            ("\u{2212}5", -5.0),
            ("- 5", -5.0),
            ("+7", 7.0),
            ("1/2", 0.5),
            ("3 1/2", 3.5),
            ("3-1/2", 3.5),
            ("1'200", 1200.0),
            ("5.", 5.0),
            ("3½", 3.5),
            ("-¼", -0.25),
        ];
        for (text, expected) in read {
            assert_eq!(value(text), Some(expected), "{text}");
        }
    }

    #[test]
    fn a_comma_that_may_be_either_is_refused_with_both_readings() {
        let chars: Vec<char> = "1,200".chars().collect();
        let message = numeral(&chars, 0).expect_err("ambiguous");
        assert_eq!(message, "\"1,200\" can be 1.200 or 1200; write one of these");
    }

    #[test]
    fn what_is_no_number_is_not_taken_for_one() {
        for text in ["", "-", "x", ".", "1,20,3", "1.2.3", "1,2,345.6.7", "1/0", "1e999", "12 34", "1234 567"]
        {
            assert_eq!(value(text), None, "{text}");
        }
    }
}
