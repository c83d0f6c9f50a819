//! Polynomials over temperature as text: "0.9 + 0.001 T - 2e-6 T² from 20 to 200 °C", T in °C.

use super::quantity::{Kind, System, read};

/// Coefficients from the constant up, and the two ends of the range, °C.
pub type Polynomial = (Vec<f64>, f64, f64);

const POWERS: [&str; 6] = ["", "T", "T²", "T³", "T⁴", "T⁵"];
const EXAMPLE: &str = "for example 0.9 + 0.001 T - 2e-6 T² from 20 to 200 °C";

/// Is this meant as a polynomial?
pub fn is_polynomial(text: &str) -> bool {
    text.contains('T') && text.contains("from")
}

/// Reads a polynomial.
///
/// # Errors
/// One sentence that says what could not be read.
pub fn read_polynomial(text: &str) -> Result<Polynomial, String> {
    let Some((terms, range)) = text.split_once("from") else {
        return Err(format!("no range is given; {EXAMPLE}"));
    };
    let range = read(range, Kind::Temperature, System::Metric)?;
    let (Some(low), Some(high)) = (range.low, range.high) else {
        return Err(format!("the range has one end only; {EXAMPLE}"));
    };
    let mut coefficients = Vec::new();
    for term in separated(terms) {
        let (number, power) = read_term(&term)?;
        if coefficients.len() <= power {
            coefficients.resize(power + 1, 0.0);
        }
        coefficients[power] += number;
    }
    Ok((coefficients, low, high))
}

/// Each term with its sign. A sign within a power of ten belongs to its number.
fn separated(text: &str) -> Vec<String> {
    let mut terms = vec![String::new()];
    for c in text.chars().filter(|c| !c.is_whitespace()) {
        let c = if c == '\u{2212}' { '-' } else { c };
        let last = &mut terms[0];
        let within = last.ends_with(['e', 'E']);
        if matches!(c, '+' | '-') && !last.is_empty() && !within {
            terms.insert(0, String::new());
        }
        terms[0].push(c);
    }
    terms.reverse();
    terms
}

/// A number and the power of T that goes with it.
fn read_term(term: &str) -> Result<(f64, usize), String> {
    let wrong = || format!("\"{term}\" is no number with a power of T; {EXAMPLE}");
    let (number, power) = match term.split_once('T') {
        None => (term, 0),
        Some((number, "")) => (number, 1),
        Some((number, power)) => {
            let ascii = power.strip_prefix('^').and_then(|digits| digits.parse().ok());
            let raised = POWERS.iter().position(|known| known.strip_prefix('T') == Some(power));
            (number, ascii.or(raised).filter(|power| *power < POWERS.len()).ok_or_else(wrong)?)
        }
    };
    let number = match number.trim_end_matches(['·', '*']) {
        "" | "+" if power > 0 => "1",
        "-" if power > 0 => "-1",
        other => other,
    };
    Ok((number.replace(',', ".").parse().map_err(|_| wrong())?, power))
}

/// Writes a polynomial so that it reads back.
pub fn write_polynomial(coefficients: &[f64], from: f64, to: f64) -> String {
    let mut text = String::new();
    for (number, power) in coefficients.iter().zip(POWERS) {
        if text.is_empty() {
            text = format!("{number}");
        } else {
            text += if number.is_sign_negative() { " - " } else { " + " };
            text += &number.abs().to_string();
        }
        if !power.is_empty() {
            text.push(' ');
            text += power;
        }
    }
    format!("{text} from {from} to {to} °C")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_polynomial_reads_back() {
        let coefficients = [0.9, -0.001, 0.0, 2e-9];
        let text = write_polynomial(&coefficients, -20.0, 200.0);
        assert_eq!(read_polynomial(&text), Ok((coefficients.to_vec(), -20.0, 200.0)), "{text}");
    }

    #[test]
    fn it_is_written_as_one_likes() {
        let meant = Ok((vec![0.0, -1.0, 2.5e-6], 20.0, 200.0));
        assert_eq!(read_polynomial("2.5e-6 T^2 - T from 20 to 200 °C"), meant);
        assert_eq!(read_polynomial("−T+2,5e-6·T² from 20 to 200"), meant);
    }

    #[test]
    fn what_cannot_be_read_is_named() {
        assert!(read_polynomial("0.9 + x T from 20 to 200 °C").is_err_and(|words| words.contains("\"+xT\"")));
        assert!(read_polynomial("0.9 + T from 20 °C").is_err_and(|words| words.contains("one end")));
        assert!(read_polynomial("0.9 + 2 T^9 from 20 to 200 °C").is_err());
    }
}
