use super::super::palette::Theme;
use super::super::testing::{Dice, Own, Recorder, columns};
use super::*;

fn random_outline(dice: &mut Dice) -> Outline<'static> {
    let radius = libm::pow(10.0, 5.0 * dice.throw() - 1.0);
    let hollow = (dice.throw() < 0.5).then_some(Hollow { radius, words: "1250.5 mm" });
    match dice.whole(0, 3) {
        0 => Outline::Slab,
        1 => Outline::Cylinder { hollow },
        _ => Outline::Sphere { hollow },
    }
}

#[test]
fn labels_never_overlap_and_never_leave_the_picture() {
    for seed in 0..600 {
        let mut dice = Dice::new(seed);
        let count = dice.whole(1, 21);
        let own = Own::random(&mut dice, count);
        let layers = columns(&own);
        let outline = random_outline(&mut dice);
        let section =
            Section { outline, layers: &layers, scale: (-60.0, 160.0), unit: "°C", when: "Mon 09:10" };
        let width = 280.0 + 620.0 * dice.throw();
        let wanted = section.height(width);
        for (height, narrower) in [(wanted, 1.0), (wanted, 0.85), (220.0 + 200.0 * dice.throw(), 1.0)] {
            let mut recorder = Recorder::new(narrower);
            section.draw(&mut recorder, Theme::Light.inks(), width, height);
            let what = format!("seed {seed}, {width} by {height}");
            recorder.check(width, height, &what);
            recorder.check_lines(&what);
        }
    }
}

#[test]
fn at_its_own_height_every_layer_and_every_joint_is_labelled() {
    for seed in 0..60 {
        let mut dice = Dice::new(seed);
        let count = dice.whole(1, 21);
        let own = Own::random(&mut dice, count);
        let layers = columns(&own);
        let outline = random_outline(&mut dice);
        let section =
            Section { outline, layers: &layers, scale: (-60.0, 160.0), unit: "°C", when: "Mon 09:10" };
        for width in [280.0, 560.0, 900.0] {
            let mut recorder = Recorder::new(1.0);
            section.draw(&mut recorder, Theme::Light.inks(), width, section.height(width));
            let said: Vec<&str> = recorder.texts.iter().map(|(text, _)| text.as_str()).collect();
            for layer in &layers {
                assert!(said.iter().any(|text| text.contains(layer.thickness_words)), "{said:?}");
            }
            let temperatures = said.iter().filter(|text| text.ends_with("°C") && text.len() > 4).count();
            assert_eq!(temperatures, count + 1);
        }
    }
}

#[test]
fn a_broken_column_draws_nothing_that_is_no_number() {
    let layers = [
        LayerColumns {
            name: "a",
            thickness: 10.0,
            thickness_words: "10 mm",
            places: &[0.0, 5.0, 10.0],
            temperatures: &[f64::NAN, 20.0, f64::INFINITY],
        },
        LayerColumns { name: "b", thickness: 10.0, thickness_words: "10 mm", places: &[], temperatures: &[] },
    ];
    for outline in [Outline::Slab, Outline::Sphere { hollow: None }] {
        for scale in [(0.0, 100.0), (20.0, 20.0), (f64::NAN, 20.0)] {
            let section = Section { outline, layers: &layers, scale, unit: "°C", when: "now" };
            let mut recorder = Recorder::new(1.0);
            section.draw(&mut recorder, Theme::Light.inks(), 320.0, 300.0);
            recorder.check(320.0, 300.0, "broken");
        }
    }
}

#[test]
fn the_table_carries_both_sides_of_a_contact() {
    let layers = [
        LayerColumns {
            name: "wall",
            thickness: 10.0,
            thickness_words: "10 mm",
            places: &[0.0, 10.0],
            temperatures: &[80.0, 78.0],
        },
        LayerColumns {
            name: "lagging",
            thickness: 80.0,
            thickness_words: "80 mm",
            places: &[10.0, 90.0],
            temperatures: &[70.0, 22.04],
        },
    ];
    let section = Section {
        outline: Outline::Slab,
        layers: &layers,
        scale: (0.0, 100.0),
        unit: "°C",
        when: "Mon 09:10",
    };
    let table = section.table();
    assert_eq!(table.columns, ["Layer", "Thickness", "Inner side, °C", "Outer side, °C"]);
    assert_eq!(table.rows[0], ["wall", "10 mm", "80.0", "78.0"]);
    assert_eq!(table.rows[1], ["lagging", "80 mm", "70.0", "22.0"]);
    assert_eq!(
        section.description(),
        "Slab cut open, from the inside out. wall, 10 mm: 80.0 to 78.0 °C; lagging, 80 mm: 70.0 to 22.0 °C."
    );
}
