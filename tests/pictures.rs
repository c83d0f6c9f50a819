//! Every kind of picture, on every theme, at the widths of a phone, a column and a wide screen: the files go to
//! `target/pictures`, to be looked at.

use std::fs;
use std::path::Path;
use stillheat::picture::{
    Cursor, Curve, CurveLine, Event, EventKind, Hollow, LayerColumns, Limit, NAMES, Outline, Picture,
    Profile, Section, Shown, Theme, description, svg,
};
use stillheat::units::clock::Clock;
use stillheat::units::quantity::System;

const WIDTHS: [f64; 3] = [320.0, 560.0, 900.0];

fn write(name: &str, picture: &dyn Picture) {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("target/pictures");
    fs::create_dir_all(&folder).expect("a folder in target");
    for (theme_name, theme) in [("light", Theme::Light), ("dark", Theme::Dark), ("print", Theme::Print)] {
        for width in WIDTHS {
            let file = svg(picture, theme, name, width, picture.height(width));
            assert!(file.starts_with("<svg ") && file.ends_with("</svg>\n"));
            assert!(!file.contains("NaN") && !file.contains("inf"));
            assert_eq!(file, svg(picture, theme, name, width, picture.height(width)), "the same bytes again");
            fs::write(folder.join(format!("{name}-{theme_name}-{width}.svg")), file)
                .expect("a file in target");
        }
    }
    let table = picture.table();
    assert!(table.rows.iter().all(|row| row.len() == table.columns.len()), "{name}: a full table");
}

/// A layer with temperatures along straight or bent lines.
struct Own {
    name: &'static str,
    thickness: f64,
    words: &'static str,
    places: Vec<f64>,
    temperatures: Vec<f64>,
}

/// Layers from (name, thickness, its words, temperature at its inner and at its outer side).
fn layers(given: &[(&'static str, f64, &'static str, f64, f64)], bend: f64) -> Vec<Own> {
    let mut begin = 0.0;
    given
        .iter()
        .map(|&(name, thickness, words, a, b)| {
            let parts: Vec<f64> = (0..=20).map(|i| f64::from(i) / 20.0).collect();
            let own = Own {
                name,
                thickness,
                words,
                places: parts.iter().map(|part| begin + part * thickness).collect(),
                temperatures: parts.iter().map(|s| a + (b - a) * (s + bend * s * (s - 1.0))).collect(),
            };
            begin += thickness;
            own
        })
        .collect()
}

fn columns(own: &[Own]) -> Vec<LayerColumns<'_>> {
    own.iter()
        .map(|layer| LayerColumns {
            name: layer.name,
            thickness: layer.thickness,
            thickness_words: layer.words,
            places: &layer.places,
            temperatures: &layer.temperatures,
        })
        .collect()
}

fn vessel() -> Vec<Own> {
    layers(
        &[
            ("Water, self-mixing", 400.0, "400 mm", 77.4, 77.4),
            ("Stainless 1.4301", 8.0, "8 mm", 76.9, 76.8),
            ("Mineral wool", 80.0, "80 mm", 76.8, 22.8),
        ],
        0.15,
    )
}

fn wall() -> Vec<Own> {
    layers(
        &[
            ("Firebrick", 230.0, "230 mm", 812.0, 610.0),
            ("Insulating brick", 115.0, "115 mm", 590.0, 240.0),
            ("Calcium silicate board", 50.0, "50 mm", 240.0, 92.0),
            ("Steel casing", 6.0, "6 mm", 88.0, 87.6),
        ],
        0.0,
    )
}

#[test]
fn sections() {
    let own = vessel();
    let layers_of_vessel = columns(&own);
    let vessel = Section {
        outline: Outline::Cylinder { hollow: None },
        layers: &layers_of_vessel,
        scale: (18.0, 94.0),
        unit: "°C",
        when: "Mon 09:10",
    };
    write("section-vessel", &vessel);
    let own = wall();
    let layers_of_wall = columns(&own);
    let wall = Section {
        outline: Outline::Slab,
        layers: &layers_of_wall,
        scale: (20.0, 850.0),
        unit: "°C",
        when: "Mon 09:10",
    };
    write("section-wall", &wall);
    let own = layers(
        &[("Steel pipe", 6.0, "6 mm", 148.2, 148.0), ("Mineral wool", 60.0, "60 mm", 148.0, 31.0)],
        0.3,
    );
    let layers_of_pipe = columns(&own);
    let hollow = Some(Hollow { radius: 50.0, words: "50 mm" });
    let pipe = Section {
        outline: Outline::Cylinder { hollow },
        layers: &layers_of_pipe,
        scale: (20.0, 150.0),
        unit: "°C",
        when: "after 3 h",
    };
    write("section-pipe", &pipe);
    let hollow = Some(Hollow { radius: 1_500.0, words: "1.5 m" });
    let tank = Section { outline: Outline::Cylinder { hollow }, ..wall };
    write("section-kiln", &tank);
    let own = layers(&[("Steel ball", 30.0, "30 mm", 640.0, 410.0)], 0.5);
    let layers_of_ball = columns(&own);
    let ball = Section {
        outline: Outline::Sphere { hollow: None },
        layers: &layers_of_ball,
        scale: (20.0, 800.0),
        unit: "°C",
        when: "after 40 s",
    };
    write("section-ball", &ball);
    let many: Vec<(&str, f64, &str, f64, f64)> = (0..12)
        .map(|i| {
            let a = 90.0 - 6.0 * f64::from(i);
            if i % 2 == 0 {
                ("Plywood", 18.0, "18 mm", a, a - 5.0)
            } else {
                ("Glue", 0.3, "0.3 mm", a, a - 6.0)
            }
        })
        .collect();
    let own = layers(&many, 0.0);
    let layers_of_many = columns(&own);
    let many = Section {
        outline: Outline::Slab,
        layers: &layers_of_many,
        scale: (10.0, 95.0),
        unit: "°C",
        when: "now",
    };
    write("section-many", &many);
    write("section-many-round", &Section { outline: Outline::Sphere { hollow: None }, ..many });
}

/// A course from one temperature towards another.
fn course(times: &[f64], from: f64, to: f64, hours: f64) -> Vec<f64> {
    times.iter().map(|t| to + (from - to) * libm::exp(-t / (hours * 3_600.0))).collect()
}

#[test]
fn curves() {
    let times: Vec<f64> = (0..=288).map(|i| f64::from(i) * 900.0).collect();
    let (contents, low, high) = (
        course(&times, 92.0, 18.0, 74.0),
        course(&times, 92.0, 18.0, 66.0),
        course(&times, 92.0, 18.0, 84.0),
    );
    let (cladding, probe) = (course(&times, 26.0, 18.5, 74.0), course(&times, 58.0, 18.0, 60.0));
    let lines = [
        CurveLine { name: "hottest of the contents", values: &contents, band: Some((&low, &high)) },
        CurveLine { name: "probe in the lagging", values: &probe, band: None },
        CurveLine { name: "outer face", values: &cladding, band: None },
    ];
    let limits = [
        Limit { value: 60.0, words: "contents below 60 °C" },
        Limit { value: 45.0, words: "cladding below 45 °C" },
    ];
    let events = [
        Event { time: 41.9 * 3_600.0, value: Some(60.0), words: "ready Mon 23:55", kind: EventKind::Ready },
        Event {
            time: 60.0 * 3_600.0,
            value: None,
            words: "may stand until Tue 18:00",
            kind: EventKind::Standing,
        },
    ];
    let weekend = Curve {
        times: &times,
        lines: &lines,
        limits: &limits,
        events: &events,
        cursor: Some(Cursor { time: 27.0 * 3_600.0, words: "Mon 09:00" }),
        stop: Clock::parse("2026-03-01T06:00"),
        unit: "°C",
    };
    write("curve-weekend", &weekend);
    write("curve-hours", &Curve { stop: None, cursor: None, ..weekend });
    write(
        "curve-plain",
        &Curve { lines: &lines[..1], limits: &limits[..1], events: &events[..1], ..weekend },
    );
    let times: Vec<f64> = (0..=100).map(|i| f64::from(i) * 1.2).collect();
    let (centre, face) = (course(&times, 850.0, 25.0, 0.02), course(&times, 820.0, 25.0, 0.008));
    let lines = [
        CurveLine { name: "centre", values: &centre, band: None },
        CurveLine { name: "outer face", values: &face, band: None },
    ];
    let limits = [Limit { value: 300.0, words: "hottest below 300 °C" }];
    let quench = Curve { lines: &lines, times: &times, limits: &limits, events: &[], stop: None, ..weekend };
    write("curve-quench", &Curve { cursor: Some(Cursor { time: 40.0, words: "40 s" }), ..quench });
}

#[test]
fn profiles() {
    let now = vessel();
    let start = layers(
        &[
            ("Water, self-mixing", 400.0, "400 mm", 92.0, 92.0),
            ("Stainless 1.4301", 8.0, "8 mm", 91.4, 91.3),
            ("Mineral wool", 80.0, "80 mm", 91.3, 26.0),
        ],
        0.1,
    );
    let (now, start) = (columns(&now), columns(&start));
    let profile = Profile {
        layers: &now,
        start: &start,
        scale: (18.0, 92.0),
        unit: "°C",
        places: "mm from the axis",
        when: "Mon 09:10",
    };
    write("profile-vessel", &profile);
    let now = wall();
    let start = layers(
        &[
            ("Firebrick", 230.0, "230 mm", 850.0, 700.0),
            ("Insulating brick", 115.0, "115 mm", 660.0, 300.0),
            ("Calcium silicate board", 50.0, "50 mm", 300.0, 110.0),
            ("Steel casing", 6.0, "6 mm", 100.0, 99.0),
        ],
        0.0,
    );
    let (now, start) = (columns(&now), columns(&start));
    let places = "mm from the inner face";
    write("profile-wall", &Profile { layers: &now, start: &start, scale: (20.0, 850.0), places, ..profile });
}

#[test]
fn examples() {
    for example in stillheat::scenario::examples() {
        let solved = stillheat::solve(example.text).expect("an example is answered");
        let shown = Shown::new(&solved, System::Metric);
        let time = 0.4 * shown.end();
        for name in NAMES {
            shown.picture(name, time, &mut |picture| write(&format!("{}-{name}", example.id), picture));
            assert!(!description(name, &shown, time).is_empty());
        }
    }
}
