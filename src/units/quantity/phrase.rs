//! The grammar of a written quantity: amounts, units, and how roughly they are known.

use super::Kind;
use super::number::{Numeral, numeral, quoted};

/// A written quantity, taken apart.
#[derive(Debug, PartialEq)]
pub(super) struct Phrase {
    pub(super) amount: Amount,
    pub(super) known: Known,
}

/// How well it is known.
#[derive(Debug, PartialEq)]
pub(super) enum Known {
    /// `8`
    Exactly,
    /// `6 to 12`: the amount is the lower end.
    UpTo(Amount),
    /// `8 (6 to 12)`
    Between(Amount, Amount),
    /// `8 ± 2`
    Within(Amount),
    /// `8 ± 25 %`
    WithinPercent(f64),
}

/// One or more numbers, each with its unit: `2 h 30 min`.
#[derive(Debug, PartialEq)]
pub(super) struct Amount {
    pub(super) parts: Vec<Part>,
}

/// A number and its unit.
#[derive(Debug, PartialEq)]
pub(super) struct Part {
    pub(super) numeral: Numeral,
    pub(super) unit: Option<String>,
}

/// Takes a text apart; its characters are plain ones.
///
/// # Errors
/// What is wrong with it, as a sentence without full stop.
pub(super) fn phrase(chars: &[char], kind: Kind) -> Result<Phrase, String> {
    let mut reader = Reader { chars, at: 0, kind };
    let mut amount = reader.amount()?;
    let known = reader.known(&mut amount)?;
    reader.skip_spaces();
    if reader.at < chars.len() {
        return Err(format!("{} cannot be understood here", quoted(&chars[reader.at..])));
    }
    Ok(Phrase { amount, known })
}

struct Reader<'a> {
    chars: &'a [char],
    at: usize,
    kind: Kind,
}

impl Reader<'_> {
    fn peek(&self, ahead: usize) -> Option<char> {
        self.chars.get(self.at + ahead).copied()
    }

    fn skip_spaces(&mut self) {
        while self.peek(0) == Some(' ') {
            self.at += 1;
        }
    }

    /// Goes past a character if it stands here.
    fn eat(&mut self, c: char) -> bool {
        let here = self.peek(0) == Some(c);
        self.at += usize::from(here);
        here
    }

    fn numeral(&mut self) -> Result<Numeral, String> {
        self.skip_spaces();
        if let Some(found) = numeral(self.chars, self.at)? {
            self.at = found.span.end;
            return Ok(found);
        }
        if self.at == self.chars.len() {
            return Err("a number is missing at the end".to_owned());
        }
        Err(format!("a number is expected where {} stands", quoted(&self.chars[self.at..])))
    }

    fn amount(&mut self) -> Result<Amount, String> {
        let first = self.numeral()?;
        if self.kind == Kind::Duration && self.peek(0) == Some(':') {
            return self.as_on_a_clock(first);
        }
        let mut parts = vec![Part { numeral: first, unit: self.unit() }];
        while self.starts_a_part() {
            let numeral = self.numeral()?;
            parts.push(Part { numeral, unit: self.unit() });
        }
        Ok(Amount { parts })
    }

    /// Behind a unit, does another number follow at once: the 30 of `2 h 30 min`?
    fn starts_a_part(&mut self) -> bool {
        self.skip_spaces();
        self.peek(0).is_some_and(|c| c.is_ascii_digit())
    }

    /// `2:30`, `2:30:15`, `2:30 h`: hours, minutes, seconds.
    fn as_on_a_clock(&mut self, hours: Numeral) -> Result<Amount, String> {
        let begin = hours.span.start;
        let mut parts = vec![Part { numeral: Numeral { plain: false, ..hours }, unit: Some("h".to_owned()) }];
        for unit in ["min", "s"] {
            if !self.eat(':') {
                break;
            }
            let numeral = self.numeral()?;
            let two_digits = numeral.span.len() == 2 && numeral.decimals == 0 && numeral.value < 60.0;
            if !two_digits || numeral.negative {
                return Err(format!("{} is no time of hours:minutes", quoted(&self.chars[begin..self.at])));
            }
            parts.push(Part { numeral, unit: Some(unit.to_owned()) });
        }
        match self.unit().as_deref() {
            None | Some("h" | "hr" | "hrs" | "hours") => Ok(Amount { parts }),
            Some(other) => Err(format!("\"{other}\" does not go with hours:minutes")),
        }
    }

    /// How well the amount is known; takes the unit behind a bracket for the amount.
    fn known(&mut self, amount: &mut Amount) -> Result<Known, String> {
        self.skip_spaces();
        if self.eat_to() {
            return Ok(Known::UpTo(self.amount()?));
        }
        if self.eat_plus_minus() {
            let known = self.half_width()?;
            if matches!(known, Known::WithinPercent(_)) {
                take_unit(amount, self.unit());
            }
            return Ok(known);
        }
        if self.eat('(') {
            self.skip_spaces();
            if self.eat_plus_minus() {
                let known = self.half_width()?;
                self.skip_spaces();
                return if self.eat(')') { Ok(known) } else { Err("a bracket is not closed".to_owned()) };
            }
            let low = self.amount()?;
            self.skip_spaces();
            let high = if self.eat_to() { Some(self.amount()?) } else { None };
            self.skip_spaces();
            let (Some(high), true) = (high, self.eat(')')) else {
                return Err(
                    "in brackets stand the lowest and the highest value, as in 8 (6 to 12)".to_owned()
                );
            };
            take_unit(amount, self.unit());
            return Ok(Known::Between(low, high));
        }
        Ok(Known::Exactly)
    }

    /// What stands behind `±`.
    fn half_width(&mut self) -> Result<Known, String> {
        let numeral = self.numeral()?;
        self.skip_spaces();
        if self.eat('%') {
            return Ok(Known::WithinPercent(numeral.value));
        }
        self.at = numeral.span.start;
        Ok(Known::Within(self.amount()?))
    }

    /// `to`, a hyphen or dash, two or more points.
    fn eat_to(&mut self) -> bool {
        let points = self.chars[self.at..].iter().take_while(|&&c| c == '.').count();
        if self.word() == "to" || points >= 2 {
            self.at += points.max(2);
            return true;
        }
        self.eat('-') || self.eat('…')
    }

    /// `±`, `+-`, `+/-`.
    fn eat_plus_minus(&mut self) -> bool {
        let signs = [&['±'][..], &['+', '-'], &['+', '/', '-']];
        let found = signs.iter().find(|sign| self.chars[self.at..].starts_with(sign));
        self.at += found.map_or(0, |sign| sign.len());
        found.is_some()
    }

    /// The letters that stand here, in small ones.
    fn word(&self) -> String {
        self.chars[self.at..]
            .iter()
            .take_while(|c| c.is_alphabetic())
            .flat_map(|c| c.to_lowercase())
            .collect()
    }

    /// The unit that stands here, if any.
    fn unit(&mut self) -> Option<String> {
        self.skip_spaces();
        let begin = self.at;
        let mut brackets = 0_usize;
        while let Some(c) = self.peek(0) {
            let after_letter = self.at > begin && self.chars[self.at - 1].is_alphabetic();
            if c.is_alphabetic() && !after_letter && self.word() == "to" {
                break;
            }
            match c {
                '(' if self.letter_follows() => brackets += 1,
                ')' if brackets > 0 => brackets -= 1,
                _ if self.belongs_to_unit(c, begin) => {}
                _ => break,
            }
            self.at += 1;
        }
        let text: String = self.chars[begin..self.at].iter().collect();
        let text = text.trim();
        (!text.is_empty()).then(|| text.to_owned())
    }

    fn belongs_to_unit(&self, c: char, begin: usize) -> bool {
        let before = (self.at > begin).then(|| self.chars[self.at - 1]);
        match c {
            '°' | '\'' | '"' | '/' | '·' | '*' | '^' | '⁻' | '¹' | '²' | '³' | '℃' | '℉' | ' ' => {
                true
            }
            // Lengths and times have no powers: in `2h30min` another part begins.
            '0'..='9' if matches!(self.kind, Kind::Length | Kind::Duration) => false,
            '0'..='9' => before.is_some_and(|b| b.is_alphabetic() || matches!(b, '^' | '-')),
            '-' if before == Some('^') => true,
            '-' => before.is_some_and(|b| b != ' ') && self.letter_follows() && self.peek(1) != Some(' '),
            '.' => before.is_some() && self.peek(1) != Some('.'),
            c => c.is_alphabetic(),
        }
    }

    /// Is the next thing behind this character and spaces a letter or a degree sign?
    fn letter_follows(&self) -> bool {
        let next = self.chars[self.at + 1..].iter().find(|&&c| c != ' ');
        next.is_some_and(|c| c.is_alphabetic() || *c == '°')
    }
}

/// A unit behind all numbers is that of the amount.
fn take_unit(amount: &mut Amount, unit: Option<String>) {
    if let (Some(unit), [Part { unit: own @ None, .. }]) = (unit, amount.parts.as_mut_slice()) {
        *own = Some(unit);
    }
}
