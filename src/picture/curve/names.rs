//! The names of the lines: at their ends where there is room, else in rows above the plot.

use super::super::painter::{Anchor, Path, Point, Weight};
use super::super::pen::{Hand, Pen};
use super::super::plot::{Plot, draw_marker, line_stroke};
use super::super::spread::{fits, spread};

/// Part of the width that names at the ends may take up.
const SHARE: f64 = 0.28;
/// Gap between the plot and the names at the ends, px: room for the lines that lead there.
const LEAD: f64 = 18.0;
/// Length of the sample of a line before its name, px.
const SAMPLE: f64 = 30.0;
/// Gap between two names in a row, px.
const GAP: f64 = 18.0;

/// Where the names go.
#[derive(Clone, Debug, PartialEq)]
pub enum Names {
    /// At the ends: each name on one line or two.
    AtEnds(Vec<Vec<String>>),
    /// In rows above the plot: the names of each row with their x.
    Above(Vec<Vec<(usize, f64, String)>>),
}

impl Names {
    /// At the ends on a wide picture, above a narrow one.
    pub fn new(pen: &Pen, names: &[&str], width: f64, height: f64, narrow: bool) -> Self {
        let blocks: Vec<Vec<String>> =
            names.iter().map(|name| pen.wrapped(name, SHARE * width, Weight::Regular)).collect();
        let sizes: Vec<f64> = blocks.iter().map(|lines| block_height(pen, lines)).collect();
        if !narrow && fits(&sizes, 0.0, height) {
            Self::AtEnds(blocks)
        } else {
            Self::above(pen, names, width)
        }
    }

    fn above(pen: &Pen, names: &[&str], width: f64) -> Self {
        let mut rows: Vec<Vec<(usize, f64, String)>> = Vec::new();
        let mut x = f64::INFINITY;
        for (number, name) in names.iter().enumerate() {
            let name = pen.shortened(name, width - SAMPLE - 8.0, Weight::Regular);
            let wide = SAMPLE + 6.0 + pen.width(&name, Weight::Regular);
            if x + wide > width - 1.0 {
                rows.push(Vec::new());
                x = 1.0;
            }
            if let Some(row) = rows.last_mut() {
                row.push((number, x, name));
            }
            x += wide + GAP;
        }
        Self::Above(rows)
    }

    /// Room they take up at the right, px.
    pub fn right(&self, pen: &Pen) -> f64 {
        match self {
            Self::AtEnds(blocks) => {
                let widths = blocks.iter().flatten().map(|line| pen.width(line, Weight::Regular));
                widths.fold(0.0, f64::max) + LEAD + 6.0
            }
            Self::Above(_) => 6.0,
        }
    }

    /// Rows they take up above.
    pub fn rows(&self) -> usize {
        match self {
            Self::AtEnds(_) => 0,
            Self::Above(rows) => rows.len(),
        }
    }

    /// Draws them; `lines` are the lines as drawn.
    pub fn draw(&self, pen: &mut Pen, plot: &Plot, lines: &[Vec<Point>], pitch: f64) {
        match self {
            Self::AtEnds(blocks) => draw_ends(pen, plot, lines, blocks),
            Self::Above(rows) => draw_rows(pen, rows, pitch),
        }
    }
}

fn line_height(pen: &Pen) -> f64 {
    pen.size + 3.0
}

fn block_height(pen: &Pen, lines: &[String]) -> f64 {
    line_height(pen) * lines.len() as f64 + 4.0
}

fn ink(pen: &Pen) -> Hand {
    Hand { colour: pen.inks.ink, ..pen.quiet(Anchor::Start) }
}

/// Names beside the ends, in the order of the ends, each with a line that leads to it.
fn draw_ends(pen: &mut Pen, plot: &Plot, lines: &[Vec<Point>], blocks: &[Vec<String>]) {
    let ends = lines.iter().map(|line| line.last().copied());
    let mut order: Vec<(usize, Point)> = ends.enumerate().filter_map(|(i, end)| Some((i, end?))).collect();
    order.sort_by(|a, b| a.1.1.total_cmp(&b.1.1));
    let places: Vec<f64> = order.iter().map(|(_, end)| end.1).collect();
    let sizes: Vec<f64> = order.iter().map(|(number, _)| block_height(pen, &blocks[*number])).collect();
    let room = (plot.area.top - 6.0, plot.area.bottom + 6.0);
    for ((number, end), middle) in order.iter().zip(spread(&places, &sizes, room.0, room.1)) {
        let stroke = super::super::painter::Stroke { dash: &[], width: 1.25, ..line_stroke(pen, *number) };
        let right = plot.area.right;
        let lead = [*end, (right + 3.0, end.1), (right + LEAD - 7.0, middle), (right + LEAD - 4.0, middle)];
        pen.painter.stroke(&Path::through(&lead), &stroke);
        let lines = &blocks[*number];
        for (i, line) in lines.iter().enumerate() {
            let below = i as f64 - 0.5 * (lines.len() as f64 - 1.0);
            pen.write(line, (right + LEAD, middle + below * line_height(pen)), &ink(pen));
        }
    }
}

/// Each name after a sample of its line.
fn draw_rows(pen: &mut Pen, rows: &[Vec<(usize, f64, String)>], pitch: f64) {
    let several = rows.iter().map(Vec::len).sum::<usize>() > 1;
    for (i, row) in rows.iter().enumerate() {
        let y = (i as f64 + 0.5) * pitch;
        for (number, x, name) in row {
            let stroke = line_stroke(pen, *number);
            pen.painter.stroke(&Path::through(&[(*x, y), (x + SAMPLE, y)]), &stroke);
            if several {
                draw_marker(pen, (x + 0.5 * SAMPLE, y), *number);
            }
            pen.write(name, (x + SAMPLE + 6.0, y), &ink(pen));
        }
    }
}
