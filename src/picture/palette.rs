//! Colours: ink and paper of each theme, and the ramp from cold to hot.

use super::painter::Colour;

/// Where a picture will be seen.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Theme {
    /// On light paper.
    Light,
    /// On a dark screen.
    Dark,
}

/// Ink and paper of a theme.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Inks {
    /// Text and axes.
    pub ink: Colour,
    /// Text that may stand back.
    pub soft: Colour,
    /// Grid lines.
    pub grid: Colour,
    /// What is behind.
    pub paper: Colour,
    /// Lines of curves, to be told apart by dash and label too.
    pub lines: [Colour; 4],
}

impl Theme {
    /// Its colours.
    pub fn inks(self) -> Inks {
        match self {
            Self::Light => Inks {
                ink: Colour(31, 37, 33),
                soft: Colour(80, 91, 84),
                grid: Colour(221, 219, 209),
                paper: Colour(255, 254, 250),
                lines: [Colour(13, 98, 86), Colour(138, 66, 20), Colour(52, 72, 148), Colour(96, 60, 110)],
            },
            Self::Dark => Inks {
                ink: Colour(232, 235, 230),
                soft: Colour(169, 179, 172),
                grid: Colour(54, 61, 57),
                paper: Colour(27, 32, 29),
                lines: [
                    Colour(95, 199, 177),
                    Colour(240, 170, 110),
                    Colour(150, 175, 250),
                    Colour(215, 165, 230),
                ],
            },
        }
    }
}

/// Stops of the ramp from cold to hot: a cool blue over green to a pale amber, each step as much lighter as the
/// last, so that it reads in grey and to colour-blind eyes.
const RAMP: [(u8, u8, u8); 7] = [
    (35, 48, 100),
    (33, 82, 126),
    (40, 114, 132),
    (75, 146, 128),
    (137, 174, 120),
    (206, 195, 122),
    (255, 219, 164),
];

/// The colour of a part of the way from cold (0) to hot (1).
pub fn ramp(part: f64) -> Colour {
    let at = if part.is_finite() { part.clamp(0.0, 1.0) } else { 0.0 } * (RAMP.len() - 1) as f64;
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let low = (at.floor() as usize).min(RAMP.len() - 2);
    let share = at - low as f64;
    #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
    let mix = |a: u8, b: u8| (f64::from(a) + (f64::from(b) - f64::from(a)) * share).round() as u8;
    let (a, b) = (RAMP[low], RAMP[low + 1]);
    Colour(mix(a.0, b.0), mix(a.1, b.1), mix(a.2, b.2))
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Lightness of OKLab (Ottosson 2020).
    fn lightness(colour: Colour) -> f64 {
        let linear = |x: u8| {
            let x = f64::from(x) / 255.0;
            if x <= 0.04045 { x / 12.92 } else { libm::pow((x + 0.055) / 1.055, 2.4) }
        };
        let (r, g, b) = (linear(colour.0), linear(colour.1), linear(colour.2));
        let l = libm::cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
        let m = libm::cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
        let s = libm::cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
        0.2104542553 * l + 0.7936177850 * m - 0.0040720468 * s
    }

    #[test]
    fn each_step_of_the_ramp_is_about_as_much_lighter() {
        let steps: Vec<f64> = (0..7).map(|i| lightness(ramp(f64::from(i) / 6.0))).collect();
        let whole = steps[6] - steps[0];
        for pair in steps.windows(2) {
            let step = (pair[1] - pair[0]) / whole * 6.0;
            assert!((0.8..1.2).contains(&step), "{steps:?}");
        }
    }

    /// Contrast of WCAG 2.1.
    fn contrast(a: Colour, b: Colour) -> f64 {
        let luminance = |c: Colour| {
            let linear = |x: u8| {
                let x = f64::from(x) / 255.0;
                if x <= 0.04045 { x / 12.92 } else { libm::pow((x + 0.055) / 1.055, 2.4) }
            };
            0.2126 * linear(c.0) + 0.7152 * linear(c.1) + 0.0722 * linear(c.2)
        };
        let (a, b) = (luminance(a) + 0.05, luminance(b) + 0.05);
        if a > b { a / b } else { b / a }
    }

    #[test]
    fn text_and_lines_stand_out_from_the_paper() {
        for theme in [Theme::Light, Theme::Dark] {
            let inks = theme.inks();
            assert!(contrast(inks.ink, inks.paper) > 10.0);
            assert!(contrast(inks.soft, inks.paper) > 4.5);
            for line in inks.lines {
                assert!(contrast(line, inks.paper) > 4.5, "{line:?}");
            }
        }
    }
}
