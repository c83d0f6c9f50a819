//! A painter that remembers where texts and lines go, for tests of the geometry.

use super::layers::LayerColumns;
use super::painter::{
    ASCENT, Anchor, DESCENT, Fill, Painter, Path, Point, Rect, Step, Stroke, TextStyle, Weight,
};
use super::widths;

/// What was painted.
#[derive(Default)]
pub struct Recorder {
    /// Texts with the boxes they take up.
    pub texts: Vec<(String, Rect)>,
    /// Which of them have a rim, so that lines may run behind.
    pub rimmed: Vec<bool>,
    /// Lines that were drawn.
    pub strokes: Vec<Vec<Point>>,
    /// Every number that was painted with is finite.
    pub finite: bool,
    /// How much narrower than the table the font is.
    pub narrower: f64,
}

impl Recorder {
    /// With the widths of the table, or narrower ones.
    pub fn new(narrower: f64) -> Self {
        Self { finite: true, narrower, ..Self::default() }
    }

    /// Panics where a text leaves the picture, touches another, or is set too small, or a number is none.
    pub fn check(&self, width: f64, height: f64, what: &str) {
        assert!(self.finite, "{what}: a number that is none");
        let edge = Rect::new(-0.01, -0.01, width + 0.02, height + 0.02);
        for (i, (text, place)) in self.texts.iter().enumerate() {
            let inside = edge.holds((place.left, place.top)) && edge.holds((place.right, place.bottom));
            assert!(inside, "{what}: {text:?} leaves the picture: {place:?}");
            for (other, place_of_other) in &self.texts[..i] {
                assert!(!place.overlaps(place_of_other), "{what}: {text:?} on {other:?}");
            }
        }
    }

    /// Panics where a straight line runs through a text without a rim.
    pub fn check_lines(&self, what: &str) {
        for ((text, place), _) in self.texts.iter().zip(&self.rimmed).filter(|(_, rimmed)| !**rimmed) {
            let inner = place.grown(-0.5);
            for line in &self.strokes {
                for pair in line.windows(2) {
                    assert!(!runs_through(&inner, pair[0], pair[1]), "{what}: a line runs through {text:?}");
                }
            }
        }
    }

    fn note(&mut self, numbers: impl IntoIterator<Item = f64>) {
        self.finite &= numbers.into_iter().all(f64::is_finite);
    }

    fn note_path(&mut self, path: &Path) {
        for step in &path.steps {
            match *step {
                Step::Move((x, y)) | Step::Line((x, y)) => self.note([x, y]),
                Step::Arc { centre, radius, from, to } => {
                    self.note([centre.0, centre.1, radius, from, to]);
                    assert!(radius >= 0.0, "a radius below 0");
                }
                Step::Close => {}
            }
        }
    }
}

/// Does the straight line from `a` to `b` touch the box? Cut to it side by side (Liang, Barsky 1984).
fn runs_through(place: &Rect, a: Point, b: Point) -> bool {
    let (mut begin, mut end) = (0.0_f64, 1.0_f64);
    let sides = [
        (a.0 - b.0, a.0 - place.left),
        (b.0 - a.0, place.right - a.0),
        (a.1 - b.1, a.1 - place.top),
        (b.1 - a.1, place.bottom - a.1),
    ];
    for (slope, room) in sides {
        if slope == 0.0 {
            if room < 0.0 {
                return false;
            }
        } else if slope < 0.0 {
            begin = begin.max(room / slope);
        } else {
            end = end.min(room / slope);
        }
    }
    begin <= end
}

impl Painter for Recorder {
    fn fill(&mut self, path: &Path, fill: &Fill) {
        self.note_path(path);
        if let Fill::Linear { stops, .. } | Fill::Radial { stops, .. } = fill {
            self.note(stops.iter().map(|(place, _)| *place));
            assert!(stops.windows(2).all(|pair| pair[0].0 <= pair[1].0), "stops ascend");
            assert!(stops.iter().all(|(place, _)| (-1e-9..=1.0 + 1e-9).contains(place)), "stops from 0 to 1");
        }
    }

    fn stroke(&mut self, path: &Path, _: &Stroke) {
        self.note_path(path);
        let points = path.steps.iter().filter_map(|step| match *step {
            Step::Move(point) | Step::Line(point) => Some(point),
            Step::Arc { .. } | Step::Close => None,
        });
        self.strokes.push(points.collect());
    }

    fn text(&mut self, text: &str, at: Point, style: &TextStyle) {
        self.note([at.0, at.1]);
        assert!(style.size >= 12.0, "{text:?} is too small");
        assert!(!text.trim().is_empty(), "an empty text");
        let width = self.text_width(text, style.size, style.weight);
        let left = match style.anchor {
            Anchor::Start => at.0,
            Anchor::Middle => at.0 - 0.5 * width,
            Anchor::End => at.0 - width,
        };
        let place = Rect {
            left,
            right: left + width,
            top: at.1 - ASCENT * style.size,
            bottom: at.1 + DESCENT * style.size,
        };
        self.texts.push((text.to_owned(), place));
        self.rimmed.push(style.rim.is_some());
    }

    fn text_width(&self, text: &str, size: f64, weight: Weight) -> f64 {
        self.narrower * widths::text_width(text, size, weight)
    }
}

/// A small generator of numbers, so that every run of a test sees the same.
pub struct Dice(u64);

impl Dice {
    /// Begun with a seed.
    pub fn new(seed: u64) -> Self {
        Self(seed.wrapping_mul(2).wrapping_add(1))
    }

    /// From 0 to 1.
    pub fn throw(&mut self) -> f64 {
        self.0 = self.0.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        (self.0 >> 40) as f64 / f64::from(1 << 24)
    }

    /// From `low` up to, without, `high`.
    pub fn whole(&mut self, low: usize, high: usize) -> usize {
        let span = (high - low) as f64;
        // Within the span by construction.
        #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss)]
        let above = (self.throw() * span) as usize;
        low + above.min(high - low - 1)
    }
}

/// A layer of the tests, owning its columns.
pub struct Own {
    name: &'static str,
    thickness: f64,
    words: String,
    places: Vec<f64>,
    temperatures: Vec<f64>,
}

const NAMES: [&str; 8] = [
    "Water",
    "Stainless 1.4301",
    "Mineral wool",
    "A layer with a very long name that somebody typed in full",
    "Ölschicht",
    "W",
    "重油",
    "lagging",
];

impl Own {
    /// Layers of 0.1 to 1000 mm with any temperatures.
    pub fn random(dice: &mut Dice, count: usize) -> Vec<Self> {
        let mut begin = 0.0;
        (0..count)
            .map(|_| {
                let thickness = libm::pow(10.0, 4.0 * dice.throw() - 1.0);
                let nodes = dice.whole(1, 30);
                let place = |i: usize| begin + thickness * i as f64 / (nodes - 1).max(1) as f64;
                let own = Self {
                    name: NAMES[dice.whole(0, NAMES.len())],
                    thickness,
                    words: format!("{thickness:.1} mm"),
                    places: (0..nodes).map(place).collect(),
                    temperatures: (0..nodes).map(|_| 200.0 * dice.throw() - 50.0).collect(),
                };
                begin += thickness;
                own
            })
            .collect()
    }
}

/// The columns of such layers.
pub fn columns(own: &[Own]) -> Vec<LayerColumns<'_>> {
    own.iter()
        .map(|layer| LayerColumns {
            name: layer.name,
            thickness: layer.thickness,
            thickness_words: &layer.words,
            places: &layer.places,
            temperatures: &layer.temperatures,
        })
        .collect()
}
