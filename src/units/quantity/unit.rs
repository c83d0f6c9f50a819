//! Units as people write them: names, powers and strokes, taken apart.

use crate::units::{ZERO_CELSIUS, celsius};

/// Powers of length, mass, time and temperature.
pub(super) type Dimension = [i8; 4];

/// A unit: `number * multiply / divide` is SI.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct Unit {
    multiply: f64,
    divide: f64,
    pub(super) dimension: Dimension,
    /// The scale, where the unit is nothing but a degree.
    scale: Option<Scale>,
}

/// Where a temperature scale has its zero.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Scale {
    Celsius,
    Fahrenheit,
    Kelvin,
}

/// A unit that has a name of its own.
struct Named {
    /// As typed; small letters stand for both, a name with a capital for itself alone.
    names: &'static [&'static str],
    multiply: f64,
    divide: f64,
    dimension: Dimension,
    scale: Option<Scale>,
}

const LENGTH: Dimension = [1, 0, 0, 0];
const AREA: Dimension = [2, 0, 0, 0];
const VOLUME: Dimension = [3, 0, 0, 0];
const MASS: Dimension = [0, 1, 0, 0];
const TIME: Dimension = [0, 0, 1, 0];
const DEGREE: Dimension = [0, 0, 0, 1];
const ENERGY: Dimension = [2, 1, -2, 0];
const POWER: Dimension = [2, 1, -3, 0];

/// All factors are exact by definition: NIST Special Publication 811 (2008), appendix B; inch, foot, pound by the
/// agreement of 1959; the Btu of the International Table is 1055.05585262 J, its calorie 4.1868 J.
const NAMED: &[Named] = &[
    named(&["m", "metre", "metres", "meter", "meters"], 1.0, 1.0, LENGTH),
    named(&["dm"], 1.0, 10.0, LENGTH),
    named(&["cm"], 1.0, 100.0, LENGTH),
    named(&["mm"], 1.0, 1_000.0, LENGTH),
    named(&["µm", "um", "micron", "microns"], 1.0, 1_000_000.0, LENGTH),
    named(&["in", "inch", "inches", "\"", "''"], 0.0254, 1.0, LENGTH),
    named(&["mil", "mils", "thou"], 0.0254, 1_000.0, LENGTH),
    named(&["ft", "foot", "feet", "'"], 0.3048, 1.0, LENGTH),
    named(&["yd"], 0.9144, 1.0, LENGTH),
    named(&["sqft", "sq ft"], 0.092_903_04, 1.0, AREA),
    named(&["l", "litre", "litres", "liter", "liters"], 1.0, 1_000.0, VOLUME),
    named(&["cuft", "cu ft"], 0.028_316_846_592, 1.0, VOLUME),
    named(&["kg"], 1.0, 1.0, MASS),
    named(&["g"], 1.0, 1_000.0, MASS),
    named(&["t"], 1_000.0, 1.0, MASS),
    named(&["lb", "lbs", "lbm"], 0.453_592_37, 1.0, MASS),
    named(&["s", "sec", "second", "seconds"], 1.0, 1.0, TIME),
    named(&["min", "mins", "minute", "minutes"], 60.0, 1.0, TIME),
    named(&["h", "hr", "hrs", "hour", "hours"], 3_600.0, 1.0, TIME),
    named(&["d", "day", "days"], 86_400.0, 1.0, TIME),
    named(&["week", "weeks"], 604_800.0, 1.0, TIME),
    degree(&["k", "°k", "kelvin"], 1.0, 1.0, Scale::Kelvin),
    degree(&["c", "°c", "℃", "degc", "deg c", "celsius"], 1.0, 1.0, Scale::Celsius),
    degree(&["f", "°f", "℉", "degf", "deg f", "fahrenheit"], 5.0, 9.0, Scale::Fahrenheit),
    named(&["j"], 1.0, 1.0, ENERGY),
    named(&["kj"], 1_000.0, 1.0, ENERGY),
    named(&["MJ"], 1_000_000.0, 1.0, ENERGY),
    named(&["cal"], 4.1868, 1.0, ENERGY),
    named(&["kcal"], 4_186.8, 1.0, ENERGY),
    named(&["btu", "btus"], 1_055.055_852_62, 1.0, ENERGY),
    named(&["w"], 1.0, 1.0, POWER),
    named(&["mW"], 1.0, 1_000.0, POWER),
    named(&["kw"], 1_000.0, 1.0, POWER),
    named(&["MW"], 1_000_000.0, 1.0, POWER),
];

const fn named(names: &'static [&'static str], multiply: f64, divide: f64, dimension: Dimension) -> Named {
    Named { names, multiply, divide, dimension, scale: None }
}

const fn degree(names: &'static [&'static str], multiply: f64, divide: f64, scale: Scale) -> Named {
    Named { names, multiply, divide, dimension: DEGREE, scale: Some(scale) }
}

impl Unit {
    /// Takes a unit apart; none where a name in it is not known.
    pub(super) fn parse(text: &str) -> Option<Self> {
        let chars: Vec<char> = text.chars().collect();
        let mut unit = Self { multiply: 1.0, divide: 1.0, dimension: [0; 4], scale: None };
        if text.trim_end().ends_with('/') {
            return None;
        }
        let (mut at, mut below, mut factors) = (0, false, 0);
        while let Some(&c) = chars.get(at) {
            if c == '/' {
                below = true;
                at += 1;
            } else if matches!(c, ' ' | '·' | '*' | '.' | '-' | '(' | ')') {
                at += 1;
            } else {
                let (name, length) = longest_name(&chars[at..])?;
                let (power, after) = power(&chars, at + length)?;
                unit.times(name, power, below);
                factors += 1;
                unit.scale = if factors == 1 && power == 1 && !below { name.scale } else { None };
                at = after;
            }
        }
        Some(unit)
    }

    /// Multiplies by a power of a named unit; `below` a stroke by its inverse.
    fn times(&mut self, name: &Named, power: i8, below: bool) {
        let inverse = below != (power < 0);
        let (up, down) = if inverse { (name.divide, name.multiply) } else { (name.multiply, name.divide) };
        for _ in 0..power.unsigned_abs() {
            self.multiply *= up;
            self.divide *= down;
        }
        let signed = if below { -power } else { power };
        for (sum, one) in self.dimension.iter_mut().zip(name.dimension) {
            *sum = sum.saturating_add(one.saturating_mul(signed));
        }
    }

    /// How large it is, in SI.
    pub(super) fn size(&self) -> f64 {
        self.multiply / self.divide
    }

    /// Is it the kelvin, which measures differences as well as temperatures?
    pub(super) fn is_kelvin(&self) -> bool {
        self.scale == Some(Scale::Kelvin)
    }

    /// A number of it in `1/per` of the SI unit.
    pub(super) fn scaled(&self, per: f64, number: f64) -> f64 {
        if self.is_one(per) { number } else { tidy(number * (self.multiply * per) / self.divide) }
    }

    /// The other way, to rounding.
    pub(super) fn unscaled(&self, per: f64, number: f64) -> f64 {
        if self.is_one(per) { number } else { number * self.divide / (self.multiply * per) }
    }

    /// Is it `1/per` of the SI unit itself?
    fn is_one(&self, per: f64) -> bool {
        (self.multiply * per).to_bits() == self.divide.to_bits()
    }

    /// A reading on its scale in °C.
    pub(super) fn to_celsius(&self, reading: f64) -> f64 {
        match self.scale {
            Some(Scale::Kelvin) => tidy(celsius(reading)),
            Some(Scale::Fahrenheit) => tidy((reading - 32.0) * 5.0 / 9.0),
            Some(Scale::Celsius) | None => reading,
        }
    }

    /// A temperature in °C as a reading on its scale, to rounding.
    pub(super) fn reading(&self, celsius: f64) -> f64 {
        match self.scale {
            Some(Scale::Kelvin) => celsius + ZERO_CELSIUS,
            Some(Scale::Fahrenheit) => celsius * 9.0 / 5.0 + 32.0,
            Some(Scale::Celsius) | None => celsius,
        }
    }
}

/// The number to 14 significant digits, which is what a conversion leaves standing.
pub(super) fn tidy(x: f64) -> f64 {
    format!("{x:.13e}").parse().unwrap_or(x)
}

fn longest_name(chars: &[char]) -> Option<(&'static Named, usize)> {
    let mut best: Option<(&Named, usize)> = None;
    for unit in NAMED {
        for name in unit.names {
            let length = name.chars().count();
            if length > best.map_or(0, |(_, longest)| longest) && begins_with(chars, name) {
                best = Some((unit, length));
            }
        }
    }
    best
}

fn begins_with(chars: &[char], name: &str) -> bool {
    let exact = name.chars().any(|c| c.is_ascii_uppercase());
    let mut rest = chars.iter();
    name.chars()
        .all(|c| rest.next().is_some_and(|&found| found == c || (!exact && found.to_ascii_lowercase() == c)))
}

/// The power that stands at a place (1 where none does), and the place after it: `²`, `2`, `^2`, `⁻²`, `^-2`.
fn power(chars: &[char], at: usize) -> Option<(i8, usize)> {
    let raised = chars.get(at) == Some(&'^');
    let mut digit_at = at + usize::from(raised);
    let negative = match chars.get(digit_at) {
        Some('⁻') => true,
        Some('-') => raised,
        _ => false,
    };
    digit_at += usize::from(negative);
    let size = match chars.get(digit_at) {
        Some('¹' | '1') => 1,
        Some('²' | '2') => 2,
        Some('³' | '3') => 3,
        _ if raised || negative => return None,
        _ => return Some((1, at)),
    };
    Some((if negative { -size } else { size }, digit_at + 1))
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    fn size(text: &str) -> f64 {
        Unit::parse(text).expect(text).size()
    }

    #[test]
    fn one_unit_may_be_written_in_many_ways() {
        let ways = [
            "W/m²K",
            "W/m2K",
            "W/(m² K)",
            "W/m^2/K",
            "w/m2k",
            "W / m² °C",
            "W/m²·K",
            "W/(m2.C)",
            "W m⁻² K⁻¹",
            "W m^-2 K^-1",
            "W/m³K",
        ];
        for way in &ways[..10] {
            assert_eq!(Unit::parse(way).map(|unit| unit.dimension), Some([0, 1, -3, -1]), "{way}");
            assert_relative_eq!(size(way), 1.0);
        }
        assert_ne!(Unit::parse(ways[10]).map(|unit| unit.dimension), Some([0, 1, -3, -1]));
        for way in ["Btu/h ft² °F", "BTU/(hr·ft²·°F)", "btu/hft2f", "Btu/hr-ft2-F", "Btu/h/sq ft/degF"]
        {
            // NIST SP 811, appendix B.8: 5.678263 W/(m² K).
            assert_relative_eq!(size(way), 5.678_263, max_relative = 1e-6);
        }
    }

    #[test]
    fn factors_are_those_of_nist_sp_811() {
        let printed = [
            ("Btu/h ft °F", 1.730_735),
            ("Btu in/h ft² °F", 0.144_227_9),
            ("Btu/lb °F", 4_186.8),
            ("h ft² °F/Btu", 0.176_110_2),
            ("Btu/h ft²", 3.154_591),
            ("lb/ft³", 16.018_46),
            ("g/cm³", 1_000.0),
            ("kcal/m²h°C", 1.163),
            ("mW/mK", 0.001),
            ("kJ/kgK", 1_000.0),
        ];
        for (unit, factor) in printed {
            // Seven digits are printed.
            assert_relative_eq!(size(unit), factor, max_relative = 3e-7);
        }
    }

    #[test]
    fn a_capital_tells_milliwatt_from_megawatt() {
        assert_relative_eq!(size("mW"), 1e-3);
        assert_relative_eq!(size("MW"), 1e6);
        assert_ne!(Unit::parse("mw").map(|unit| unit.dimension), Some(POWER));
    }

    #[test]
    fn what_is_no_unit_is_none() {
        for text in ["x", "m^", "mmx", "°", "W/m²Q", "é", "m⁻", "W/", "m4"] {
            assert_eq!(Unit::parse(text), None, "{text}");
        }
    }

    #[test]
    fn conversion_leaves_tidy_numbers() {
        assert_eq!(Unit::parse("in").unwrap().scaled(1.0, 3.0).to_string(), "0.0762");
        assert_eq!(Unit::parse("Btu/lb°F").unwrap().scaled(1.0, 1.0).to_string(), "4186.8");
        assert_eq!(Unit::parse("K").unwrap().to_celsius(291.0).to_string(), "17.85");
        assert_eq!(Unit::parse("°F").unwrap().to_celsius(104.0).to_string(), "40");
    }
}
