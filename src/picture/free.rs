//! Finding a free place for a label inside a plot.

use super::painter::{Point, Rect};

/// What a label must not touch, and what it should not cover.
#[derive(Clone, Debug, Default)]
pub struct Taken {
    boxes: Vec<Rect>,
    points: Vec<Point>,
}

/// Points along lines are this far apart, px: no label slips between two.
const APART: f64 = 4.0;

/// A gap that labels keep from each other, px.
const GAP: f64 = 3.0;

impl Taken {
    /// Nothing may touch this box.
    pub fn keep_off(&mut self, place: Rect) {
        self.boxes.push(place);
    }

    /// Labels should not cover this line.
    pub fn spare(&mut self, line: &[Point]) {
        for pair in line.windows(2) {
            let (a, b) = (pair[0], pair[1]);
            let length = libm::hypot(b.0 - a.0, b.1 - a.1);
            let parts = (length / APART).ceil().clamp(1.0, 1e4);
            let mut i = 0.0;
            while i < parts {
                let part = i / parts;
                self.points.push((a.0 + (b.0 - a.0) * part, a.1 + (b.1 - a.1) * part));
                i += 1.0;
            }
        }
    }

    /// Of the places, the first that covers least, and takes it; none where all touch what must not be touched.
    pub fn best<T: Copy>(&mut self, places: impl Iterator<Item = (T, Rect)>, within: &Rect) -> Option<T> {
        let free = places.filter(|(_, place)| {
            let inside = within.holds((place.left, place.top)) && within.holds((place.right, place.bottom));
            inside && !self.boxes.iter().any(|taken| taken.overlaps(&place.grown(GAP)))
        });
        let covers = |place: &Rect| self.points.iter().filter(|point| place.holds(**point)).count();
        let (what, place) = free.min_by_key(|(_, place)| covers(&place.grown(1.0)))?;
        self.boxes.push(place);
        Some(what)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_label_goes_where_it_covers_no_line_and_touches_no_label() {
        let mut taken = Taken::default();
        taken.spare(&[(0.0, 10.0), (100.0, 10.0)]);
        let within = Rect::new(0.0, 0.0, 100.0, 60.0);
        let places = || {
            [5.0, 25.0, 45.0].into_iter().enumerate().map(|(i, top)| (i, Rect::new(10.0, top, 30.0, 10.0)))
        };
        assert_eq!(taken.best(places(), &within), Some(1));
        assert_eq!(taken.best(places(), &within), Some(2));
        assert_eq!(taken.best(places(), &within), Some(0));
        assert_eq!(taken.best(places(), &within), None);
        assert_eq!(Taken::default().best(places(), &Rect::new(0.0, 0.0, 20.0, 60.0)), None);
    }
}
