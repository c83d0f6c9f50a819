//! A slab cut open: its layers side by side, the inside on the left.

use super::super::colour::Colour;
use super::super::number::Ticks;
use super::super::painter::{Fill, Path, Rect, Stroke};
use super::super::pen::Pen;
use super::cut::Cut;
use super::rows::{Row, rows};
use super::{Layout, Section, isotherm_stroke, side_stroke, write_row};

/// Draws the block and its rows; the cut, and whether there are isotherms.
pub fn draw(pen: &mut Pen, section: &Section, layout: &Layout, ticks: &Ticks, most: usize) -> (Cut, bool) {
    let block = layout.item;
    let cut = Cut::new(section.layers, 0.0, block.width());
    let isotherms = Section::isotherms(&cut, ticks);
    shade(pen, section, &cut, block);
    for (t, px) in &isotherms {
        let stroke = isotherm_stroke(pen.inks, section, *t);
        pen.upright(block.left + px, block.top, block.bottom, &stroke);
    }
    for (number, px) in cut.at.iter().enumerate().take(section.layers.len()).skip(1) {
        let stroke = side_stroke(pen.inks, section, section.layers[number].inside());
        pen.upright(block.left + px, block.top, block.bottom, &stroke);
    }
    pen.painter.stroke(&Path::rect(block), &Stroke::plain(pen.inks.ink, 1.0));
    let rows = rows(section, &cut, most);
    let pitch = block.height() / rows.len() as f64;
    for (i, row) in rows.iter().enumerate() {
        let y = (block.top + (i as f64 + 0.5) * pitch).round();
        point_at(pen, row, layout, y);
        write_row(pen, row, layout, y);
    }
    (cut, !isotherms.is_empty())
}

fn shade(pen: &mut Pen, section: &Section, cut: &Cut, block: Rect) {
    let stops: Vec<(f64, Colour)> = cut
        .stops(pen.inks, section.scale())
        .into_iter()
        .map(|(px, colour)| (px / block.width(), colour))
        .collect();
    let fill = Fill::Linear { from: (block.left, block.top), to: (block.right, block.top), stops: &stops };
    pen.painter.fill(&Path::rect(block), &fill);
}

/// A dot on what the row is about, and a line from it to the text.
fn point_at(pen: &mut Pen, row: &Row, layout: &Layout, y: f64) {
    let x = layout.item.left + row.along;
    let (ink, paper) = (pen.inks.ink, pen.inks.paper);
    let halo = Stroke { opacity: 0.55, ..Stroke::plain(paper, 3.0) };
    pen.across(y, x, layout.item.right, &halo);
    pen.across(y, x, layout.text - 6.0, &Stroke::plain(ink, 1.0));
    let middle = (x, pen.snapped(y, 1.0));
    pen.fill(&Path::circle(middle, 3.5), paper);
    pen.fill(&Path::circle(middle, 2.5), ink);
}
