//! The colours of a picture: three themes and the ramp from cold to hot.
//!
//! The ramp is our own: indigo, slate blue, sage, sand, amber. Its lightness (CIELAB) rises in even steps, so
//! that it keeps its order in grey, in print and for every kind of colour vision.

use super::colour::Colour;

/// Steps of the ramp, cold first. Made in `OKLCh`: lightness solved so that CIELAB L* runs from 26 to 84 in even
/// steps; hue 272° to 72° by way of 228°, 195°, 110° and 80°; chroma 0.13, 0.06 in the middle, 0.13.
const RAMP: [u32; 17] = [
    0x2a_36_83, 0x25_42_87, 0x20_4e_8a, 0x1f_5a_8c, 0x24_65_8e, 0x2d_6f_8f, 0x39_79_8f, 0x47_83_8d,
    0x59_8d_8c, 0x72_96_79, 0x99_99_6d, 0xb5_9e_62, 0xcf_a3_5b, 0xe4_a9_53, 0xf5_b0_52, 0xfe_bb_60,
    0xfe_c8_84,
];

/// Greys of the print theme, cold first: CIELAB L* from 36 to 96 in even steps.
const GREYS: [u32; 17] = [
    0x55_55_55, 0x5e_5e_5e, 0x67_67_67, 0x70_70_70, 0x79_79_79, 0x83_83_83, 0x8d_8d_8d, 0x96_96_96,
    0xa0_a0_a0, 0xaa_aa_aa, 0xb5_b5_b5, 0xbf_bf_bf, 0xc9_c9_c9, 0xd4_d4_d4, 0xde_de_de, 0xe9_e9_e9,
    0xf3_f3_f3,
];

/// Where a picture will be seen.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Theme {
    /// On a light screen.
    Light,
    /// On a dark screen.
    Dark,
    /// On paper: black, white and greys.
    Print,
}

impl Theme {
    /// Its colours.
    pub fn inks(self) -> &'static Inks {
        match self {
            Self::Light => &LIGHT,
            Self::Dark => &DARK,
            Self::Print => &PRINT,
        }
    }
}

/// The colours of a theme.
#[derive(Clone, Debug, PartialEq)]
pub struct Inks {
    /// What the picture stands on.
    pub paper: Colour,
    /// Main lines and text.
    pub ink: Colour,
    /// Second text.
    pub quiet: Colour,
    /// Grid lines.
    pub grid: Colour,
    /// Where the layers of a profile are shaded: every other one.
    pub shade: Colour,
    /// The time the slider stands at.
    pub cursor: Colour,
    /// Lines of a curve, in order; used again from the first.
    pub lines: [Colour; 6],
    ramp: [u32; 17],
}

static LIGHT: Inks = Inks {
    paper: Colour::hex(0xff_fe_fb),
    ink: Colour::hex(0x1d_24_20),
    quiet: Colour::hex(0x56_60_5a),
    grid: Colour::hex(0xe6_e4_db),
    shade: Colour::hex(0xf4_f2_ea),
    cursor: Colour::hex(0x0d_6a_58),
    lines: [
        Colour::hex(0x0d_6a_58),
        Colour::hex(0xb9_75_07),
        Colour::hex(0x2b_2e_55),
        Colour::hex(0xbb_5d_b1),
        Colour::hex(0x41_35_01),
        Colour::hex(0x5b_97_5d),
    ],
    ramp: RAMP,
};

static DARK: Inks = Inks {
    paper: Colour::hex(0x1c_21_1e),
    ink: Colour::hex(0xe9_ec_e7),
    quiet: Colour::hex(0xa9_b3_ac),
    grid: Colour::hex(0x33_3a_36),
    shade: Colour::hex(0x25_2b_28),
    cursor: Colour::hex(0x61_c3_aa),
    lines: [
        Colour::hex(0x61_c3_aa),
        Colour::hex(0xd5_85_26),
        Colour::hex(0x8a_8c_fb),
        Colour::hex(0xbd_6a_b5),
        Colour::hex(0xe3_e7_aa),
        Colour::hex(0x60_a2_60),
    ],
    ramp: RAMP,
};

static PRINT: Inks = Inks {
    paper: Colour::WHITE,
    ink: Colour::BLACK,
    quiet: Colour::hex(0x3c_3c_3c),
    grid: Colour::hex(0xd4_d4_d4),
    shade: Colour::hex(0xf2_f2_f2),
    cursor: Colour::BLACK,
    lines: [
        Colour::BLACK,
        Colour::hex(0x5a_5a_5a),
        Colour::BLACK,
        Colour::hex(0x5a_5a_5a),
        Colour::BLACK,
        Colour::hex(0x5a_5a_5a),
    ],
    ramp: GREYS,
};

impl Inks {
    /// The colour of a place on the ramp, 0 cold to 1 hot; the end colours outside.
    pub fn ramp(&self, place: f64) -> Colour {
        let last = self.ramp.len() - 1;
        let at = if place.is_finite() { place.clamp(0.0, 1.0) } else { 0.0 } * last as f64;
        // Between 0 and the last step by construction.
        #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
        let below = (at as usize).min(last - 1);
        Colour::hex(self.ramp[below]).towards(Colour::hex(self.ramp[below + 1]), at - below as f64)
    }

    /// The colour of the n-th line of a curve.
    pub fn line(&self, number: usize) -> Colour {
        self.lines[number % self.lines.len()]
    }
}

#[cfg(test)]
mod tests {
    use super::super::colour::sight::{DEUTERANOPIA, FULL, PROTANOPIA, difference, lab};
    use super::*;

    const ALL: [&Inks; 3] = [&LIGHT, &DARK, &PRINT];

    #[test]
    fn lightness_rises_in_even_steps_from_cold_to_hot() {
        for inks in ALL {
            let lightness: Vec<f64> =
                (0..=64).map(|i| lab(inks.ramp(f64::from(i) / 64.0), &FULL)[0]).collect();
            let mean = (lightness[64] - lightness[0]) / 64.0;
            assert!(mean > 0.9, "58 of 100 or more between cold and hot");
            // Colours have 8 bits per primary: steps of 0.9 come within a fifth of it.
            for i in 4..=64 {
                let step = (lightness[i] - lightness[i - 4]) / 4.0;
                assert!((step - mean).abs() < 0.2 * mean, "{i}: {step} against {mean}");
            }
        }
    }

    #[test]
    fn nine_steps_of_the_ramp_are_told_apart_by_every_eye() {
        for inks in ALL {
            for eye in [&FULL, &PROTANOPIA, &DEUTERANOPIA] {
                let steps: Vec<Colour> = (0..9).map(|i| inks.ramp(f64::from(i) / 8.0)).collect();
                for i in 0..9 {
                    for j in 0..i {
                        let apart = difference(steps[i], steps[j], eye);
                        // Twice noticeable is 4; even lightness alone gives 7.5 for neighbours.
                        assert!(apart > 7.0 * (i - j).min(4) as f64, "{i} and {j}: {apart}");
                    }
                }
            }
        }
    }

    #[test]
    fn text_is_readable_on_the_ground_and_on_the_ramp() {
        for inks in ALL {
            for text in [inks.ink, inks.quiet, inks.cursor] {
                assert!(text.contrast(inks.paper) >= 4.5);
                assert!(text.contrast(inks.shade) >= 4.5);
            }
            for i in 0..=64 {
                let colour = inks.ramp(f64::from(i) / 64.0);
                assert!(colour.contrast(colour.ink_on()) >= 4.5);
            }
        }
    }

    #[test]
    fn lines_stand_out_from_the_ground_and_from_each_other() {
        for inks in ALL {
            for line in inks.lines {
                // WCAG 2.2, 1.4.11: graphics 3:1.
                assert!(line.contrast(inks.paper) >= 3.0, "{}", line.css());
            }
        }
        for inks in [&LIGHT, &DARK] {
            for eye in [&FULL, &PROTANOPIA, &DEUTERANOPIA] {
                for (i, a) in inks.lines.iter().enumerate() {
                    for b in &inks.lines[..i] {
                        // Ten times noticeable; dash and marker tell them apart, too.
                        let apart = difference(*a, *b, eye);
                        assert!(apart > 20.0, "{} and {}: {apart}", a.css(), b.css());
                    }
                }
            }
        }
    }

    #[test]
    fn outside_the_ramp_are_its_ends() {
        assert_eq!(LIGHT.ramp(-3.0), LIGHT.ramp(0.0));
        assert_eq!(LIGHT.ramp(7.0), LIGHT.ramp(1.0));
        assert_eq!(LIGHT.ramp(f64::NAN), LIGHT.ramp(0.0));
    }
}
