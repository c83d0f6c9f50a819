//! Flags above the plot: each event has a pole at its time and its words beside the top of the pole.

use super::super::painter::{Anchor, Weight};
use super::super::pen::Pen;

/// A flag, placed.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Flag {
    /// Number of the event.
    pub event: usize,
    /// Where its pole stands, px.
    pub x: f64,
    /// Row above the plot, 0 the lowest.
    pub row: usize,
    /// To which side of the pole its words are.
    pub anchor: Anchor,
    /// From which px to which px they go.
    span: (f64, f64),
}

/// Gap between a pole and its words, and between words, px.
pub const GAP: f64 = 5.0;
/// No more rows than this.
const MOST_ROWS: usize = 4;

/// Flags for the poles (event, px, words) between `left` and `right`; one that finds no place is left out.
pub fn place(pen: &Pen, poles: &[(usize, f64, &str)], left: f64, right: f64) -> Vec<Flag> {
    let mut poles = poles.to_vec();
    poles.sort_by(|a, b| b.1.total_cmp(&a.1));
    let mut flags: Vec<Flag> = Vec::new();
    for &(event, x, words) in &poles {
        let width = pen.width(words, Weight::Bold);
        let before = |from: f64| poles.iter().filter(|pole| pole.1 < x && pole.1 > from).count();
        let sides = [(Anchor::Start, (x + GAP, x + GAP + width)), (Anchor::End, (x - GAP - width, x - GAP))];
        let found = sides.into_iter().filter(|(_, span)| span.0 >= left && span.1 <= right).find_map(
            |(anchor, span)| {
                // Words to the left leave the rows below to the poles they reach over.
                let lowest = if anchor == Anchor::End { before(span.0 - GAP) } else { 0 };
                let flag = |row| Flag { event, x, row, anchor, span };
                (lowest..MOST_ROWS).map(flag).find(|flag| flags.iter().all(|other| stand(flag, other)))
            },
        );
        flags.extend(found);
    }
    flags
}

/// How many rows they take up.
pub fn rows(flags: &[Flag]) -> usize {
    flags.iter().map(|flag| flag.row + 1).max().unwrap_or(0)
}

/// Do two flags keep clear of each other: words of words, words of poles?
fn stand(a: &Flag, b: &Flag) -> bool {
    let words = a.row != b.row || a.span.1 + GAP <= b.span.0 || b.span.1 + GAP <= a.span.0;
    words && clear(a, b) && clear(b, a)
}

/// Do the words of one keep clear of the pole of the other, which goes up to its own row?
fn clear(words: &Flag, pole: &Flag) -> bool {
    pole.row < words.row || pole.x + GAP <= words.span.0 + 0.5 * GAP || pole.x >= words.span.1 + 0.5 * GAP
}

impl Flag {
    /// Where its words begin or end, px.
    pub fn words_at(&self) -> f64 {
        if self.anchor == Anchor::Start { self.x + GAP } else { self.x - GAP }
    }
}
