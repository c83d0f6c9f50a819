use super::super::palette::Theme;
use super::super::testing::{Dice, Recorder};
use super::*;

const NAMES: [&str; 6] = [
    "hottest of the contents",
    "outer face",
    "coldest of the whole item",
    "mean of the lagging",
    "probe in the middle of the lower third of the second layer",
    "T1",
];

const WORDS: [&str; 4] =
    ["ready Tue 14:20", "standing ends Wed 02:15", "contents below 60 °C: Mon 09:10", "cladding: at once"];

#[test]
fn labels_never_overlap_and_never_leave_the_picture() {
    for seed in 0..500 {
        let mut dice = Dice::new(seed);
        let end = libm::pow(10.0, 1.0 + 6.5 * dice.throw());
        let times: Vec<f64> = (0..=60).map(|i| end * f64::from(i) / 60.0).collect();
        let count = dice.whole(1, 7);
        let values: Vec<Vec<f64>> = (0..count)
            .map(|_| {
                let (a, b, k) =
                    (200.0 * dice.throw() - 50.0, 200.0 * dice.throw() - 50.0, 5.0 * dice.throw());
                times.iter().map(|t| a + (b - a) * (1.0 - libm::exp(-k * t / end))).collect()
            })
            .collect();
        let lines: Vec<CurveLine> = values
            .iter()
            .map(|values| CurveLine { name: NAMES[dice.whole(0, 6)], values, band: Some((values, values)) })
            .collect();
        let limits: Vec<Limit> = (0..dice.whole(0, 5))
            .map(|_| Limit { value: 180.0 * dice.throw() - 40.0, words: WORDS[dice.whole(0, 4)] })
            .collect();
        let events: Vec<Event> = (0..dice.whole(0, 5))
            .map(|i| Event {
                time: 1.1 * end * dice.throw(),
                value: (dice.throw() < 0.7).then(|| 100.0 * dice.throw()),
                words: WORDS[dice.whole(0, 4)],
                kind: if i % 2 == 0 { EventKind::Ready } else { EventKind::Standing },
            })
            .collect();
        let cursor = Some(Cursor { time: end * (1.2 * dice.throw() - 0.1), words: "Mon 09:10" });
        let stop = if dice.throw() < 0.5 { Clock::parse("2026-03-01T06:10") } else { None };
        let curve = Curve {
            times: &times,
            lines: &lines,
            limits: &limits,
            events: &events,
            cursor,
            stop,
            unit: "°C",
        };
        let width = 280.0 + 620.0 * dice.throw();
        for (height, narrower) in [(curve.height(width), 1.0), (curve.height(width), 0.85), (460.0, 1.0)] {
            let mut recorder = Recorder::new(narrower);
            curve.draw(&mut recorder, Theme::Light.inks(), width, height);
            let what = format!("seed {seed}, {width} by {height}");
            recorder.check(width, height, &what);
            recorder.check_lines(&what);
        }
    }
}

fn example<'a>(times: &'a [f64], lines: &'a [CurveLine<'a>]) -> Curve<'a> {
    Curve {
        times,
        lines,
        limits: &[Limit { value: 60.0, words: "contents below 60 °C" }],
        events: &[Event {
            time: 50.0 * 3_600.0,
            value: Some(60.0),
            words: "ready Tue 08:00",
            kind: EventKind::Ready,
        }],
        cursor: Some(Cursor { time: 86_400.0, words: "Mon 06:00" }),
        stop: Clock::parse("2026-03-01T06:00"),
        unit: "°C",
    }
}

#[test]
fn everything_that_matters_is_named() {
    let times = [0.0, 3.0 * 86_400.0];
    let lines = [
        CurveLine { name: "hottest of the contents", values: &[92.0, 48.0], band: None },
        CurveLine { name: "outer face", values: &[24.0, 21.0], band: None },
    ];
    for width in [280.0, 480.0, 900.0] {
        let curve = example(&times, &lines);
        let mut recorder = Recorder::new(1.0);
        curve.draw(&mut recorder, Theme::Light.inks(), width, curve.height(width));
        let said: Vec<&str> = recorder.texts.iter().map(|(text, _)| text.as_str()).collect();
        for words in ["contents below 60 °C", "ready Tue 08:00", "Mon 06:00", "°C", "60"] {
            assert!(said.contains(&words), "{words} in {said:?} at {width}");
        }
        assert!(said.join(" ").contains("hottest of the contents"), "{said:?}");
    }
}

#[test]
fn the_table_has_the_ticks_the_ends_and_the_events() {
    let times = [0.0, 3.0 * 86_400.0];
    let lines = [CurveLine { name: "hottest", values: &[92.0, 56.0], band: None }];
    let table = example(&times, &lines).table();
    assert_eq!(table.columns, ["Time", "hottest, °C"]);
    assert_eq!(table.rows[0], ["Sun 06:00 1 Mar", "92.0"]);
    assert!(table.rows.contains(&vec!["Tue 08:00 3 Mar".to_owned(), "67.0".to_owned()]));
    assert_eq!(table.rows[table.rows.len() - 1], ["Wed 06:00 4 Mar", "56.0"]);
}

#[test]
fn no_times_or_broken_values_still_draw() {
    for (times, values) in
        [(&[][..], &[][..]), (&[0.0, 60.0][..], &[f64::NAN, f64::INFINITY][..]), (&[5.0][..], &[1.0][..])]
    {
        let lines = [CurveLine { name: "hottest", values, band: Some((values, values)) }];
        let curve = Curve { limits: &[Limit { value: f64::NAN, words: "a" }], ..example(times, &lines) };
        let mut recorder = Recorder::new(1.0);
        curve.draw(&mut recorder, Theme::Light.inks(), 320.0, 250.0);
        recorder.check(320.0, 250.0, "broken");
        assert!(!curve.description().contains("NaN"));
    }
}
