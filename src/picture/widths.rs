//! How wide a text is where no font can be asked: a table of advance widths that errs on the wide side.
//!
//! Each entry is the wider of the advance widths in `DejaVu` Sans 2.37 and Liberation Sans 2.1, in hundredths of
//! the font size, rounded up; `DejaVu` Sans is among the widest fonts that "sans-serif" stands for. Labels placed
//! by this table have room to spare in the others.

use super::painter::Weight;

/// From space to tilde.
const REGULAR: [u8; 95] = [
    32, 41, 46, 84, 64, 96, 78, 28, 40, 40, 50, 84, 32, 37, 32, 34, 64, 64, 64, 64, 64, 64, 64, 64, 64, 64,
    34, 34, 84, 84, 84, 56, 102, 69, 69, 73, 78, 67, 62, 78, 76, 30, 50, 67, 56, 87, 75, 79, 67, 79, 73, 67,
    62, 74, 69, 99, 69, 67, 69, 40, 34, 40, 84, 56, 50, 62, 64, 55, 64, 62, 36, 64, 64, 28, 28, 58, 28, 98,
    64, 62, 64, 64, 42, 53, 40, 64, 60, 82, 60, 60, 53, 64, 34, 64, 84,
];

/// From space to tilde.
const BOLD: [u8; 95] = [
    35, 46, 53, 84, 70, 101, 88, 31, 46, 46, 53, 84, 38, 42, 38, 37, 70, 70, 70, 70, 70, 70, 70, 70, 70, 70,
    40, 40, 84, 84, 84, 62, 100, 78, 77, 74, 84, 69, 69, 83, 84, 38, 56, 78, 64, 100, 84, 86, 74, 86, 78, 73,
    69, 82, 78, 111, 78, 73, 73, 46, 37, 46, 84, 56, 50, 68, 72, 60, 72, 68, 44, 72, 72, 35, 35, 67, 35, 105,
    72, 69, 72, 72, 50, 60, 48, 72, 66, 93, 65, 66, 59, 72, 37, 72, 84,
];

/// Width of a line of text, in the unit of `size`.
pub fn text_width(text: &str, size: f64, weight: Weight) -> f64 {
    text.chars().map(|letter| f64::from(hundredths(letter, weight))).sum::<f64>() * size / 100.0
}

fn hundredths(letter: char, weight: Weight) -> u8 {
    let (table, wider) = match weight {
        Weight::Regular => (&REGULAR, 0),
        Weight::Bold => (&BOLD, 8),
    };
    match letter {
        ' '..='~' => table[letter as usize - 0x20],
        // Combining marks stand over the letter before.
        '\u{300}'..='\u{36f}' => 0,
        '°' | '²' | '³' | '·' | '\u{a0}' => 50,
        '–' => 56,
        '−' | '±' | '×' | '≤' | '≥' => 84,
        'µ' | '’' => 64 + wider,
        'Æ' | 'æ' | 'Œ' | 'œ' | 'Ŵ' | 'ŵ' => 110 + wider,
        'ß'..='ÿ' | 'Ā'..='ſ' if letter.is_lowercase() => 82 + wider,
        'À'..='ſ' => 92 + wider,
        // Greek.
        '\u{370}'..='\u{3ff}' => 94 + wider,
        // Cyrillic and the scripts whose letters fill a square.
        _ => 142,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn a_text_is_as_wide_as_its_letters() {
        assert_relative_eq!(text_width("60 °C", 10.0, Weight::Regular), 28.3, max_relative = 1e-12);
        assert_relative_eq!(text_width("", 10.0, Weight::Bold), 0.0);
    }

    #[test]
    fn bold_is_never_narrower() {
        for letter in ('\u{20}'..'\u{500}').filter(|letter| *letter != '@' && *letter != '`') {
            assert!(hundredths(letter, Weight::Bold) >= hundredths(letter, Weight::Regular), "{letter}");
        }
    }
}
