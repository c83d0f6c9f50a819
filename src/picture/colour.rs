//! Colours and how far apart they look.

/// Red, green, blue as the screen takes them (sRGB), 0 to 255 each.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Colour(pub u8, pub u8, pub u8);

impl Colour {
    /// Black.
    pub const BLACK: Self = Self(0, 0, 0);
    /// White.
    pub const WHITE: Self = Self(255, 255, 255);

    /// From `0xrrggbb`.
    pub const fn hex(rgb: u32) -> Self {
        let [_, red, green, blue] = rgb.to_be_bytes();
        Self(red, green, blue)
    }

    /// "#rrggbb"
    pub fn css(self) -> String {
        format!("#{:02x}{:02x}{:02x}", self.0, self.1, self.2)
    }

    /// Part of the way to another colour, 0 to 1.
    #[must_use]
    pub fn towards(self, other: Self, part: f64) -> Self {
        let mix = |a: u8, b: u8| {
            let value = f64::from(a) + (f64::from(b) - f64::from(a)) * part.clamp(0.0, 1.0);
            // Between 0 and 255 by construction.
            #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
            let byte = value.round() as u8;
            byte
        };
        Self(mix(self.0, other.0), mix(self.1, other.1), mix(self.2, other.2))
    }

    /// Relative luminance, 0 to 1 (WCAG 2.2, "relative luminance"; IEC 61966-2-1 for the curve).
    pub fn luminance(self) -> f64 {
        let [red, green, blue] = self.linear();
        0.2126 * red + 0.7152 * green + 0.0722 * blue
    }

    /// Contrast ratio of two colours, 1 to 21 (WCAG 2.2, "contrast ratio").
    pub fn contrast(self, other: Self) -> f64 {
        let (a, b) = (self.luminance(), other.luminance());
        (a.max(b) + 0.05) / (a.min(b) + 0.05)
    }

    /// Black or white, whichever is easier to read on this colour; always 4.5:1 or better.
    #[must_use]
    pub fn ink_on(self) -> Self {
        if self.contrast(Self::BLACK) >= self.contrast(Self::WHITE) { Self::BLACK } else { Self::WHITE }
    }

    /// Light of each primary, 0 to 1.
    fn linear(self) -> [f64; 3] {
        [self.0, self.1, self.2].map(|byte| {
            let c = f64::from(byte) / 255.0;
            if c <= 0.040_45 { c / 12.92 } else { libm::pow((c + 0.055) / 1.055, 2.4) }
        })
    }
}

/// How colours look to people, for the checks of the palette.
#[cfg(test)]
pub mod sight {
    use super::Colour;

    /// What is left of the light of the primaries for an eye without one kind of cone.
    type Eye = [[f64; 3]; 3];

    /// Full colour vision.
    pub const FULL: Eye = [[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]];
    /// Protanopia (Machado, Oliveira, Fernandes 2009, table 1, severity 1.0).
    pub const PROTANOPIA: Eye = [
        [0.152_286, 1.052_583, -0.204_868],
        [0.114_503, 0.786_281, 0.099_216],
        [-0.003_882, -0.048_116, 1.051_998],
    ];
    /// Deuteranopia (same table).
    pub const DEUTERANOPIA: Eye = [
        [0.367_322, 0.860_646, -0.227_968],
        [0.280_085, 0.672_501, 0.047_413],
        [-0.011_820, 0.042_940, 0.968_881],
    ];

    /// CIELAB under D65: lightness 0 to 100, red-green, yellow-blue (CIE 15:2004, 8.2.1).
    pub fn lab(colour: Colour, eye: &Eye) -> [f64; 3] {
        let light = colour.linear();
        let seen = eye.map(|row| (row[0] * light[0] + row[1] * light[1] + row[2] * light[2]).clamp(0.0, 1.0));
        let xyz = [
            [0.412_456_4, 0.357_576_1, 0.180_437_5],
            [0.212_672_9, 0.715_152_2, 0.072_175],
            [0.019_333_9, 0.119_192, 0.950_304_1],
        ]
        .map(|row: [f64; 3]| row[0] * seen[0] + row[1] * seen[1] + row[2] * seen[2]);
        let [x, y, z] = [xyz[0] / 0.950_47, xyz[1], xyz[2] / 1.088_83]
            .map(|t| if t > 0.008_856 { libm::cbrt(t) } else { 7.787 * t + 16.0 / 116.0 });
        [116.0 * y - 16.0, 500.0 * (x - y), 200.0 * (y - z)]
    }

    /// Colour difference of 1976: about 2 is just noticeable side by side.
    pub fn difference(a: Colour, b: Colour, eye: &Eye) -> f64 {
        let (a, b) = (lab(a, eye), lab(b, eye));
        let sum: f64 = a.iter().zip(&b).map(|(p, q)| (p - q) * (p - q)).sum();
        sum.sqrt()
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn contrast_of_black_and_white_is_21() {
        assert_relative_eq!(Colour::BLACK.contrast(Colour::WHITE), 21.0, max_relative = 1e-12);
        assert_relative_eq!(Colour::WHITE.contrast(Colour::WHITE), 1.0);
    }

    #[test]
    fn ink_is_readable_on_any_colour() {
        for rgb in (0..0x0100_0000).step_by(4_099) {
            let colour = Colour::hex(rgb);
            assert!(colour.contrast(colour.ink_on()) >= 4.5, "{}", colour.css());
        }
    }

    #[test]
    fn a_colour_is_written_as_css_takes_it() {
        assert_eq!(Colour::hex(0x0f_6b_5c).css(), "#0f6b5c");
        assert_eq!(Colour::BLACK.towards(Colour::WHITE, 0.5).css(), "#808080");
    }
}
