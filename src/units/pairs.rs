//! Tables as text: "20 °C: 0.9; 200 °C: 1.0", "0 h: 150 °C; 4 h: 30 °C".

use super::quantity::{Kind, System, read, write};

/// Reads pairs of quantities: a colon between the two of a pair, a semicolon between pairs.
///
/// # Units
/// Those of the file for either kind.
///
/// # Errors
/// One sentence that names the pair and what is wrong with it.
pub fn read_pairs(text: &str, at: Kind, value: Kind, system: System) -> Result<Vec<(f64, f64)>, String> {
    let pairs = text.split(';').map(str::trim).filter(|pair| !pair.is_empty());
    pairs.map(|pair| read_pair(pair, at, value, system)).collect()
}

fn read_pair(pair: &str, at: Kind, value: Kind, system: System) -> Result<(f64, f64), String> {
    // The last colon: a time may be written as on a clock, 2:30.
    let Some((first, second)) = pair.rsplit_once(':') else {
        return Err(format!("\"{pair}\" has no colon; for example 20 °C: 0.9; 200 °C: 1.0"));
    };
    let number = |text: &str, kind| {
        let written = read(text, kind, system)?;
        if written.low.is_some() {
            Err(format!("\"{text}\" has a spread; a table takes plain numbers"))
        } else {
            Ok(written.value)
        }
    };
    Ok((number(first, at)?, number(second, value)?))
}

/// Writes pairs so that they read back.
pub fn write_pairs(pairs: &[(f64, f64)], at: Kind, value: Kind, system: System) -> String {
    let one = |pair: &(f64, f64)| {
        format!("{}: {}", write(pair.0, None, None, at, system), write(pair.1, None, None, value, system))
    };
    pairs.iter().map(one).collect::<Vec<_>>().join("; ")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn pairs_read_back() {
        let pairs = [(0.0, 150.0), (9_000.0, 30.0), (14_400.0, 20.5)];
        let text = write_pairs(&pairs, Kind::Duration, Kind::Temperature, System::Metric);
        assert_eq!(read_pairs(&text, Kind::Duration, Kind::Temperature, System::Metric), Ok(pairs.to_vec()));
        let clock = read_pairs("0: 150; 2:30: 30", Kind::Duration, Kind::Temperature, System::Metric);
        assert_eq!(clock, Ok(vec![(0.0, 150.0), (9_000.0, 30.0)]));
    }

    #[test]
    fn a_pair_without_a_colon_is_named() {
        let wrong = read_pairs("20 °C: 0.9; 200 °C", Kind::Temperature, Kind::Conductivity, System::Metric);
        assert!(wrong.is_err_and(|words| words.contains("\"200 °C\"")));
    }
}
