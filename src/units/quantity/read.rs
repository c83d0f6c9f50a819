//! From a written quantity to a number in the unit of the file.

use super::number::{plain_character, quoted};
use super::phrase::{Amount, Known, Phrase, phrase};
use super::unit::{Unit, tidy};
use super::{Kind, System, unit};

/// Nobody writes a quantity longer than this, characters.
const LONGEST: usize = 200;

/// A quantity in the unit of the file, with its ends where it is known only roughly.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Written {
    /// The likely value.
    pub value: f64,
    /// Hardly lower than this.
    pub low: Option<f64>,
    /// Hardly higher than this.
    pub high: Option<f64>,
}

impl Written {
    /// A quantity without spread.
    pub fn plain(value: f64) -> Self {
        Self { value, low: None, high: None }
    }
}

/// The value of `low to high`: the middle.
pub(super) fn middle(low: f64, high: f64) -> f64 {
    tidy(0.5 * low + 0.5 * high)
}

/// Reads a quantity; the result is in the unit of the file, see [`Kind`].
///
/// # Errors
/// One plain sentence: what was found, and examples of what is allowed.
pub fn read(text: &str, kind: Kind, system: System) -> Result<Written, String> {
    understand(text, kind, system).map_err(|wrong| format!("{wrong}; for example {}", kind.examples(system)))
}

fn understand(text: &str, kind: Kind, system: System) -> Result<Written, String> {
    let chars = plain_characters(text)?;
    let written = Reading { kind, system }.written(&phrase(&chars, kind)?)?;
    let ends = [Some(written.value), written.low, written.high];
    if ends.iter().flatten().all(|number| number.is_finite()) {
        Ok(written)
    } else {
        Err(format!("{} is too large", quoted(&chars)))
    }
}

/// The characters of a text as the readers of this room know them, as many as before.
pub(super) fn plain_characters(text: &str) -> Result<Vec<char>, String> {
    if text.trim().is_empty() {
        return Err("nothing is written here".to_owned());
    }
    if text.chars().count() > LONGEST {
        return Err("this is too long for a quantity".to_owned());
    }
    Ok(text.chars().map(plain_character).collect())
}

struct Reading {
    kind: Kind,
    system: System,
}

impl Reading {
    fn written(&self, phrase: &Phrase) -> Result<Written, String> {
        let amount = &phrase.amount;
        match &phrase.known {
            Known::Exactly => Ok(Written::plain(self.value(amount, None)?)),
            Known::UpTo(high) => {
                let (low, high) = self.ends(amount, high, None)?;
                Ok(Written { value: middle(low, high), low: Some(low), high: Some(high) })
            }
            Known::Between(low, high) => self.between(amount, low, high),
            Known::Within(half) => self.within(amount, half),
            Known::WithinPercent(percent) => self.within_percent(amount, *percent),
        }
    }

    fn between(&self, amount: &Amount, low: &Amount, high: &Amount) -> Result<Written, String> {
        let outer = own_unit(amount).or(own_unit(high)).or(own_unit(low));
        let value = self.value(amount, outer)?;
        let (low, high) = self.ends(low, high, outer)?;
        if value < low || value > high {
            return Err("the value does not lie between the two in brackets".to_owned());
        }
        Ok(Written { value, low: Some(low), high: Some(high) })
    }

    /// Lowest and highest; a unit on one of them holds for both.
    fn ends(&self, low: &Amount, high: &Amount, outer: Option<&str>) -> Result<(f64, f64), String> {
        let low_value = self.value(low, own_unit(high).or(outer))?;
        let high_value = self.value(high, own_unit(low).or(outer))?;
        if low_value > high_value {
            return Err("this runs from high to low; write the lower value first".to_owned());
        }
        Ok((low_value, high_value))
    }

    fn within(&self, amount: &Amount, half: &Amount) -> Result<Written, String> {
        let inherited = own_unit(half).filter(|unit| {
            // In `60 ± 2 K` the K belongs to the difference.
            self.kind != Kind::Temperature || !Unit::parse(unit).is_some_and(|unit| unit.is_kelvin())
        });
        let value = self.value(amount, inherited)?;
        let difference = match self.kind {
            Kind::Temperature => Self { kind: Kind::TemperatureDifference, system: self.system },
            _ => Self { ..*self },
        };
        around(value, difference.value(half, own_unit(amount))?)
    }

    fn within_percent(&self, amount: &Amount, percent: f64) -> Result<Written, String> {
        if self.kind == Kind::Temperature {
            return Err("a percentage of a temperature says nothing; write ± with kelvins".to_owned());
        }
        let value = self.value(amount, None)?;
        around(value, value.abs() * percent / 100.0)
    }

    /// An amount in the unit of the file; `outer` counts where it has no unit, else the one that is shown.
    fn value(&self, amount: &Amount, outer: Option<&str>) -> Result<f64, String> {
        let shown = unit(self.kind, self.system);
        if let [part] = amount.parts.as_slice() {
            let unit = self.unit(part.unit.as_deref().or(outer).unwrap_or(shown))?;
            return Ok(self.kind.to_file(part.numeral.value, &unit));
        }
        self.sum_of_parts(amount)
    }

    fn sum_of_parts(&self, amount: &Amount) -> Result<f64, String> {
        if !matches!(self.kind, Kind::Length | Kind::Duration) {
            return Err(format!("{} is written with one number and one unit", self.kind.name()));
        }
        let mut sum = 0.0;
        let mut size = f64::INFINITY;
        for (i, part) in amount.parts.iter().enumerate() {
            let Some(written) = part.unit.as_deref() else {
                return Err("one of the parts has no unit".to_owned());
            };
            let unit = self.unit(written)?;
            if unit.size() >= size || (i > 0 && part.numeral.negative) {
                return Err("parts go from the largest unit to the smallest".to_owned());
            }
            size = unit.size();
            sum += self.kind.to_file(part.numeral.value.abs(), &unit);
        }
        Ok(if amount.parts[0].numeral.negative { -tidy(sum) } else { tidy(sum) })
    }

    fn unit(&self, written: &str) -> Result<Unit, String> {
        let degree_alone = self.kind.dimension() == Kind::Temperature.dimension()
            && matches!(written, "°" | "deg" | "degree" | "degrees");
        let named = if degree_alone { unit(self.kind, self.system) } else { written };
        let chars: Vec<char> = written.chars().collect();
        let Some(unit) = Unit::parse(named) else {
            return Err(format!("{} is no unit that is known here", quoted(&chars)));
        };
        if unit.dimension != self.kind.dimension() {
            return Err(format!("{} is no unit for {}", quoted(&chars), self.kind.name()));
        }
        Ok(unit)
    }
}

/// The unit that is written with a single number.
fn own_unit(amount: &Amount) -> Option<&str> {
    match amount.parts.as_slice() {
        [part] => part.unit.as_deref(),
        _ => None,
    }
}

/// `value ± half`
fn around(value: f64, half: f64) -> Result<Written, String> {
    if half < 0.0 {
        return Err("what stands behind ± is not negative".to_owned());
    }
    Ok(Written { value, low: Some(tidy(value - half)), high: Some(tidy(value + half)) })
}

#[cfg(test)]
mod tests {
    use super::Kind::*;
    use super::System::{Metric, Us};
    use super::*;
    use approx::assert_relative_eq;

    fn rough(value: f64, low: f64, high: f64) -> Written {
        Written { value, low: Some(low), high: Some(high) }
    }

    #[test]
    fn a_quantity_is_read_as_written_on_paper() {
        let read_as = [
            ("400 mm", Length, 0.4),
            ("400", Length, 0.4),
            ("0,4 m", Length, 0.4),
            ("1 200 mm", Length, 1.2),
            ("10 µm", Length, 1e-5),
            ("1e-3 m", Length, 1e-3),
            ("3 in", Length, 0.0762),
            ("3 1/2 in", Length, 0.0889),
            ("1'6\"", Length, 0.4572),
            ("1 ft 6 in", Length, 0.4572),
            ("1 m 20 cm", Length, 1.2),
            ("1'200 mm", Length, 1.2),
            ("3-1/2 in", Length, 0.0889),
            ("18 °C", Temperature, 18.0),
            ("18 C", Temperature, 18.0),
            ("18 degC", Temperature, 18.0),
            ("18°", Temperature, 18.0),
            ("\u{2212}5\u{a0}°C", Temperature, -5.0),
            ("104 °F", Temperature, 40.0),
            ("291 K", Temperature, 17.85),
            ("5 K", TemperatureDifference, 5.0),
            ("9 °F", TemperatureDifference, 5.0),
            ("2 h 30 min", Duration, 9_000.0),
            ("2:30 h", Duration, 9_000.0),
            ("2:30", Duration, 9_000.0),
            ("2h30min", Duration, 9_000.0),
            ("0:00:45", Duration, 45.0),
            ("90 min", Duration, 5_400.0),
            ("1 d 4 h", Duration, 100_800.0),
            ("2.5", Duration, 9_000.0),
            ("1 g/cm³", Density, 1_000.0),
            ("4.2 kJ/(kg K)", HeatCapacity, 4_200.0),
            ("35 mW/mK", Conductivity, 0.035),
            ("8 W/m2K", Film, 8.0),
            ("8 W/(m² K)", Film, 8.0),
            ("8 W/m^2/K", Film, 8.0),
            ("8 W m⁻² K⁻¹", Film, 8.0),
            ("0.0002 m²K/W", Contact, 0.0002),
            ("0.25", Emissivity, 0.25),
            ("2 kW/m²", HeatFlux, 2_000.0),
            ("\u{2212}100", HeatFlux, -100.0),
            ("0.1 K/min", Rate, 6.0),
        ];
        for (text, kind, value) in read_as {
            assert_eq!(read(text, kind, Metric), Ok(Written::plain(value)), "{text}");
        }
    }

    #[test]
    fn without_a_unit_the_one_that_is_shown_counts() {
        assert_eq!(read("3", Length, Us), Ok(Written::plain(0.0762)));
        assert_eq!(read("104", Temperature, Us), Ok(Written::plain(40.0)));
        assert_eq!(read("9", TemperatureDifference, Us), Ok(Written::plain(5.0)));
        assert_eq!(read("1", HeatCapacity, Us), Ok(Written::plain(4_186.8)));
        assert_eq!(read("9", Rate, Us), Ok(Written::plain(5.0)));
        assert_eq!(read("400 mm", Length, Us), Ok(Written::plain(0.4)));
        let film = read("1", Film, Us).expect("a film").value;
        // NIST SP 811 prints seven digits.
        assert_relative_eq!(film, 5.678_263, max_relative = 1e-6);
    }

    #[test]
    fn a_range_is_read_with_its_middle_as_value() {
        for text in ["6 to 12 W/m²K", "6-12", "6 – 12", "6..12", "6 W/m²K to 12", "6 … 12 W/m2K", "6TO12"]
        {
            assert_eq!(read(text, Film, Metric), Ok(rough(9.0, 6.0, 12.0)), "{text}");
        }
        assert_eq!(read("380 mm to 0.42 m", Length, Metric), Ok(rough(0.4, 0.38, 0.42)));
        assert_eq!(read("0.1 to 0.5", Emissivity, Metric), Ok(rough(0.3, 0.1, 0.5)));
        assert_eq!(read("-10 to -5 °C", Temperature, Metric), Ok(rough(-7.5, -10.0, -5.0)));
        assert_eq!(read("2 h 30 min to 3 h", Duration, Metric), Ok(rough(9_900.0, 9_000.0, 10_800.0)));
        assert_eq!(read("8 (6 to 12) W/m²K", Film, Metric), Ok(rough(8.0, 6.0, 12.0)));
        assert_eq!(read("8 W/m²K (6-12)", Film, Metric), Ok(rough(8.0, 6.0, 12.0)));
        assert_eq!(read("0.4 m (380 to 500 mm)", Length, Metric), Ok(rough(0.4, 0.38, 0.5)));
    }

    #[test]
    fn plus_minus_is_read_as_a_difference() {
        for text in ["8 ± 2", "8 +- 2 W/m²K", "8 +/- 2", "8 W/m²K ± 2 W/m²K", "8 ± 25 %", "8 ±25% W/m²K"]
        {
            assert_eq!(read(text, Film, Metric), Ok(rough(8.0, 6.0, 10.0)), "{text}");
        }
        for text in ["60 ± 2", "60 °C ± 2 K", "60 ± 2 K", "60 ± 2 °C"] {
            assert_eq!(read(text, Temperature, Metric), Ok(rough(60.0, 58.0, 62.0)), "{text}");
        }
        assert_eq!(read("140 ± 9 °F", Temperature, Metric), Ok(rough(60.0, 55.0, 65.0)));
        assert_eq!(read("0.3 ± 0.1", Emissivity, Metric), Ok(rough(0.3, 0.2, 0.4)));
        assert_eq!(read("400 mm ± 1 cm", Length, Metric), Ok(rough(0.4, 0.39, 0.41)));
        assert_eq!(read("400 mm (±10 mm)", Length, Metric), Ok(rough(0.4, 0.39, 0.41)));
    }

    #[test]
    fn what_cannot_be_read_is_answered_with_one_sentence() {
        let answers = [
            ("", Length, "nothing is written here; for example 400 mm, 0.4 m or 380 to 420 mm"),
            ("thick", Length, "a number is expected where \"thick\" stands; for example"),
            ("4 parsec", Length, "\"parsec\" is no unit that is known here; for example 400 mm"),
            ("4 W", Length, "\"W\" is no unit for a length; for example 400 mm"),
            ("1,200", Length, "\"1,200\" can be 1.200 or 1200; write one of these; for example"),
            ("12 to 6", Film, "this runs from high to low; write the lower value first; for example"),
            ("8 (10 to 12)", Film, "the value does not lie between the two in brackets; for example"),
            ("8 (6)", Film, "in brackets stand the lowest and the highest value, as in 8 (6 to 12); for"),
            ("8 ± ", Film, "a number is missing at the end; for example"),
            ("8 ± -2", Film, "what stands behind ± is not negative; for example"),
            (
                "20 °C ± 10 %",
                Temperature,
                "a percentage of a temperature says nothing; write ± with kelvins; for",
            ),
            ("8 W/m²K!", Film, "\"!\" cannot be understood here; for example"),
            ("30 min 2 h", Duration, "parts go from the largest unit to the smallest; for example"),
            ("2 h 30", Duration, "one of the parts has no unit; for example"),
            ("2:75", Duration, "\"2:75\" is no time of hours:minutes; for example"),
            ("8 W/m²K 3 W/m²K", Film, "a film coefficient is written with one number and one unit; for"),
            ("1e999", Film, "\"1e999\" is too large; for example"),
            ("1e306 kcal/gK", HeatCapacity, "\"1e306 kcal/gK\" is too large; for example"),
        ];
        for (text, kind, answer) in answers {
            let message = read(text, kind, Metric).expect_err(text);
            assert!(message.contains(answer) && !message.contains('\n'), "{text}: {message}");
        }
        let long = "1".repeat(300);
        assert!(read(&long, Length, Metric).expect_err("long").starts_with("this is too long"));
    }

    #[test]
    fn the_examples_of_every_message_can_be_read() {
        for kind in Kind::ALL {
            for system in [Metric, Us] {
                for example in kind.examples(system).split(", ").flat_map(|part| part.split(" or ")) {
                    assert!(read(example, kind, system).is_ok(), "{kind:?}: {example}");
                }
            }
        }
    }
}
