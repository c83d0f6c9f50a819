//! What is wrong with an input: where, what was found, what is allowed, and what to do about it.
//!
//! Every message a user can get about a scenario is worded here, and nowhere else.

use std::fmt;

/// Problems that are told at most; the rest are counted.
pub const TOLD: usize = 100;

/// Does it stop the calculation, or stand beside the answer?
#[derive(Clone, Copy, Debug, PartialEq, Eq, serde::Serialize)]
#[serde(rename_all = "lowercase")]
pub enum Severity {
    /// Nothing can be calculated until it is mended.
    Error,
    /// The answer is calculated; the message stays beside it.
    Warning,
}

/// One thing that is wrong with an input, or unusual about it.
#[derive(Clone, Debug, PartialEq)]
pub struct Problem {
    /// Does it stop the calculation?
    pub severity: Severity,
    /// JSON Pointer (RFC 6901) to the place; empty for the whole document.
    pub path: String,
    /// What is the matter.
    pub trouble: Trouble,
}

/// What can be the matter, with the numbers that belong to it.
#[derive(Clone, Debug, PartialEq)]
pub enum Trouble {
    /// The text is no JSON.
    NotJson {
        /// Line, from 1.
        line: usize,
        /// Column, from 1.
        column: usize,
        /// What the parser said.
        detail: String,
    },
    /// A value of another JSON type was expected.
    WrongType {
        /// What was found, shortened.
        found: String,
        /// What is expected, in words: "a number", "a list".
        expected: &'static str,
    },
    /// A key that does not exist here.
    UnknownKey {
        /// The nearest key that does, if one is near.
        nearest: Option<&'static str>,
        /// All keys that are known here.
        known: &'static [&'static str],
    },
    /// A key that must be there is not.
    Missing {
        /// What it is for, in words.
        what: String,
    },
    /// The same key twice in one object.
    Repeated {
        /// The key.
        key: String,
    },
    /// A number outside its limits.
    OutOfRange {
        /// The limits it broke.
        limit: &'static Limit,
        /// The number found.
        found: f64,
    },
    /// A word that is none of the allowed ones.
    NotOneOf {
        /// The word found.
        found: String,
        /// The nearest allowed one, if one is near.
        nearest: Option<String>,
        /// All allowed ones.
        allowed: Vec<String>,
    },
    /// More of something than the program takes.
    TooMany {
        /// What there are too many of, plural.
        what: &'static str,
        /// How many were found.
        found: usize,
        /// How many are taken.
        most: usize,
    },
    /// Fewer of something than needed.
    TooFew {
        /// What there are too few of, plural.
        what: &'static str,
        /// How many were found.
        found: usize,
        /// How many are needed.
        least: usize,
    },
    /// The file was written by a newer program.
    NewerVersion {
        /// Its version.
        found: u64,
    },
    /// Two fields that cannot both hold, or a rule across fields.
    Contradiction {
        /// What contradicts what, as a whole sentence without full stop.
        words: String,
    },
    /// Unusual, but allowed.
    Unusual {
        /// What is unusual and what that means, as a whole sentence without full stop.
        words: String,
        /// What to do about it.
        hint: String,
    },
}

/// The limits of one kind of number. The check, the message, the form and the schema all read this.
#[derive(Debug, PartialEq)]
pub struct Limit {
    /// What it is, with its article: "a thickness".
    pub name: &'static str,
    /// The unit of the file, as people write it: "m", "W/m²K".
    pub unit: &'static str,
    /// Lowest allowed value, in that unit.
    pub lowest: f64,
    /// Is the lowest value itself allowed?
    pub lowest_allowed: bool,
    /// Highest allowed value, in that unit.
    pub highest: f64,
    /// What to do instead, where there is something.
    pub hint: &'static str,
}

impl Limit {
    /// Is this number within the limits? NaN never is.
    pub fn holds(&self, x: f64) -> bool {
        (x > self.lowest || (self.lowest_allowed && x >= self.lowest)) && x <= self.highest
    }
}

impl Problem {
    /// A problem that stops the calculation.
    pub fn error(path: impl Into<String>, trouble: Trouble) -> Self {
        Self { severity: Severity::Error, path: path.into(), trouble }
    }

    /// A problem that stands beside the answer.
    pub fn warning(path: impl Into<String>, trouble: Trouble) -> Self {
        Self { severity: Severity::Warning, path: path.into(), trouble }
    }

    /// What to do about it; empty where the message says all.
    pub fn hint(&self) -> String {
        match &self.trouble {
            Trouble::OutOfRange { limit, .. } => limit.hint.to_owned(),
            Trouble::UnknownKey { nearest: Some(near), .. } => format!("Did you mean \"{near}\"?"),
            Trouble::UnknownKey { nearest: None, known } => format!("Known here: {}.", known.join(", ")),
            Trouble::NotOneOf { nearest: Some(near), .. } => format!("Did you mean \"{near}\"?"),
            Trouble::Unusual { hint, .. } => hint.clone(),
            Trouble::NewerVersion { .. } => "Open it with the newer program that wrote it.".to_owned(),
            Trouble::NotJson { .. }
            | Trouble::WrongType { .. }
            | Trouble::Missing { .. }
            | Trouble::Repeated { .. }
            | Trouble::NotOneOf { nearest: None, .. }
            | Trouble::TooMany { .. }
            | Trouble::TooFew { .. }
            | Trouble::Contradiction { .. } => String::new(),
        }
    }
}

/// The problems of the reader with those that the check found beside them. What hangs on a value that could not
/// be read is left out: it stands at, above or below the same place, or beside a key that is not known and may
/// be the one that is missed.
pub fn together(read: Vec<Problem>, checked: Vec<Problem>) -> Vec<Problem> {
    let hangs_on = |later: &Problem, first: &Problem| {
        within(&later.path, &first.path)
            || within(&first.path, &later.path)
            || matches!(first.trouble, Trouble::UnknownKey { .. })
                && parent(&first.path) == parent(&later.path)
    };
    let mut all = read;
    let read = all.len();
    for problem in checked {
        if !all[..read].iter().any(|first| hangs_on(&problem, first)) {
            all.push(problem);
        }
    }
    if all.len() > TOLD {
        let words = format!("{} problems more are not told; mend these first", all.len() - TOLD);
        all.truncate(TOLD);
        all.push(Problem::error("", Trouble::Contradiction { words }));
    }
    all
}

/// Is a place the other one, or in it?
fn within(place: &str, other: &str) -> bool {
    place.strip_prefix(other).is_some_and(|rest| rest.is_empty() || rest.starts_with('/'))
}

fn parent(place: &str) -> &str {
    place.rsplit_once('/').map_or("", |(parent, _)| parent)
}

/// A number in a message: with an exponent where it would be a long row of digits.
pub fn figure(x: f64) -> String {
    if x == 0.0 || (1e-6..1e9).contains(&x.abs()) { x.to_string() } else { format!("{x:e}") }
}

/// A calculated number without the hair that binary fractions leave: 9 digits.
pub fn rounded(x: f64) -> f64 {
    format!("{x:.8e}").parse().unwrap_or(x)
}

/// A number in a message with its unit.
pub fn quantity(x: f64, unit: &str) -> String {
    if unit.is_empty() { figure(x) } else { format!("{} {unit}", figure(x)) }
}

/// Text out of a file in a message: what would steer a terminal is replaced.
pub fn printable(text: &str) -> String {
    text.chars().map(|letter| if letter.is_control() { '\u{fffd}' } else { letter }).collect()
}

impl fmt::Display for Limit {
    /// "a film coefficient is above 0 W/(m² K) and at most 1000000 W/(m² K)"
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let low = if self.lowest_allowed { "at least" } else { "above" };
        let with_unit = |x| quantity(x, self.unit);
        write!(f, "{} is {low} {} and at most {}", self.name, with_unit(self.lowest), with_unit(self.highest))
    }
}

impl fmt::Display for Trouble {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NotJson { line, column, detail } => {
                write!(f, "cannot be read as JSON at line {line}, column {column}: {detail}")
            }
            Self::WrongType { found, expected } => write!(f, "{found} found; {expected} is expected"),
            Self::UnknownKey { .. } => write!(f, "this key is not known"),
            Self::Missing { what } => write!(f, "missing; {what}"),
            Self::Repeated { key } => write!(f, "the key \"{}\" stands here twice", printable(key)),
            Self::OutOfRange { limit, found } => write!(f, "{} is not allowed; {limit}", figure(*found)),
            Self::NotOneOf { found, allowed, .. } => {
                write!(f, "\"{found}\" is not known; allowed: {}", allowed.join(", "))
            }
            Self::TooMany { what, found, most } => write!(f, "{found} {what}; at most {most} are taken"),
            Self::TooFew { what, found, least } => write!(f, "{found} {what}; at least {least} needed"),
            Self::NewerVersion { found } => {
                write!(f, "version {found} was written by a newer program; this one reads version 1")
            }
            Self::Contradiction { words } | Self::Unusual { words, .. } => write!(f, "{words}"),
        }
    }
}

impl fmt::Display for Problem {
    /// `/probes/0/from_inside_m: -0.01 is not allowed; a distance is at least 0 m and at most 1000 m`
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let place = if self.path.is_empty() { "the file" } else { &printable(&self.path) };
        write!(f, "{place}: {}", self.trouble)?;
        let hint = self.hint();
        if hint.is_empty() { Ok(()) } else { write!(f, ". {hint}") }
    }
}

/// As the page and the batch result carry it.
impl serde::Serialize for Problem {
    fn serialize<S: serde::Serializer>(&self, to: S) -> Result<S::Ok, S::Error> {
        use serde::ser::SerializeStruct;
        let mut s = to.serialize_struct("Problem", 4)?;
        s.serialize_field("severity", &self.severity)?;
        s.serialize_field("path", &self.path)?;
        s.serialize_field("message", &self.trouble.to_string())?;
        s.serialize_field("hint", &self.hint())?;
        s.end()
    }
}
