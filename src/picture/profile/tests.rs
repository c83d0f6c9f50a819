use super::super::palette::Theme;
use super::super::testing::{Dice, Own, Recorder, columns};
use super::*;

#[test]
fn labels_never_overlap_and_never_leave_the_picture() {
    for seed in 0..500 {
        let mut dice = Dice::new(seed);
        let count = dice.whole(1, 21);
        let own = Own::random(&mut dice, count);
        let layers = columns(&own);
        let start = if dice.throw() < 0.5 { &layers[..] } else { &[] };
        let profile = Profile {
            layers: &layers,
            start,
            scale: (-60.0, 160.0),
            unit: "°C",
            places: "mm from the axis",
            when: "Mon 09:10",
        };
        let width = 280.0 + 620.0 * dice.throw();
        for (height, narrower) in [(profile.height(width), 1.0), (profile.height(width), 0.85), (200.0, 1.0)]
        {
            let mut recorder = Recorder::new(narrower);
            profile.draw(&mut recorder, Theme::Light.inks(), width, height);
            let what = format!("seed {seed}, {width} by {height}");
            recorder.check(width, height, &what);
            recorder.check_lines(&what);
        }
    }
}

fn two_layers() -> [LayerColumns<'static>; 2] {
    [
        LayerColumns {
            name: "Wall",
            thickness: 10.0,
            thickness_words: "10 mm",
            places: &[0.0, 10.0],
            temperatures: &[80.0, 78.0],
        },
        LayerColumns {
            name: "Lagging",
            thickness: 80.0,
            thickness_words: "80 mm",
            places: &[50.0],
            temperatures: &[40.0],
        },
    ]
}

fn profile<'a>(layers: &'a [LayerColumns<'a>]) -> Profile<'a> {
    Profile {
        layers,
        start: &[],
        scale: (20.0, 90.0),
        unit: "°C",
        places: "mm from the inner face",
        when: "Mon 09:10",
    }
}

#[test]
fn a_contact_is_a_jump_and_a_mixed_layer_is_level() {
    let layers = two_layers();
    let profile = profile(&layers);
    let plot = Plot { area: Rect::new(0.0, 0.0, 90.0, 100.0), x: (0.0, 90.0), y: (0.0, 100.0) };
    let course = Course::new(&plot, profile.layers);
    assert_eq!(course.jumps, [[(10.0, 22.0), (10.0, 60.0)]]);
    assert_eq!(course.lines[1], [(10.0, 60.0), (50.0, 60.0), (90.0, 60.0)]);
}

#[test]
fn layers_line_and_axis_are_named() {
    let layers = two_layers();
    for width in [280.0, 900.0] {
        let mut recorder = Recorder::new(1.0);
        profile(&layers).draw(&mut recorder, Theme::Light.inks(), width, 240.0);
        let said: Vec<&str> = recorder.texts.iter().map(|(text, _)| text.as_str()).collect();
        for words in ["Wall", "Lagging", "Mon 09:10", "mm from the inner face", "°C", "40"] {
            assert!(said.contains(&words), "{words} in {said:?}");
        }
    }
}

#[test]
fn the_table_runs_through_every_layer() {
    let layers = two_layers();
    let table = Profile { start: &layers, ..profile(&layers) }.table();
    assert_eq!(table.columns, ["Layer", "mm from the inner face", "Mon 09:10, °C", "Start, °C"]);
    assert_eq!(table.rows[1], ["Wall", "5.0", "79.0", "79.0"]);
    assert_eq!(table.rows[3], ["Lagging", "10.0", "40.0", "40.0"]);
    assert_eq!(table.rows.len(), 6);
}

#[test]
fn nothing_to_draw_draws() {
    let mut recorder = Recorder::new(1.0);
    profile(&[]).draw(&mut recorder, Theme::Light.inks(), 320.0, 240.0);
    recorder.check(320.0, 240.0, "nothing");
}
