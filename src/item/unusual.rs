//! Allowed, but unusual: what stands beside the answer as a warning.

use super::{Face, Item, Side, Start};
use crate::matter::library::Material;
use crate::problem::{Problem, Trouble};
use crate::units::words;

/// Films outside this are rare in a plant, W/(m² K). Common practice, no source.
const FILM: (f64, f64) = (1.0, 20_000.0);
/// Further outside the range of a material than this is worth saying, K.
const SLACK: f64 = 1.0;

/// Writes warnings about an item; `materials` are those of its layers, in order.
pub(super) fn warn(item: &Item, materials: &[Option<Material>], problems: &mut Vec<Problem>) {
    for (number, material) in materials.iter().enumerate() {
        if let Some(material) = material {
            problems.extend(outside(item, number, material));
        }
    }
    for side in [Side::Inner, Side::Outer] {
        for (number, (_, face)) in item.face(side).rows.iter().enumerate() {
            let Face::Exchange { film, .. } = face else { continue };
            if *film > 0.0 && !(FILM.0..=FILM.1).contains(film) {
                let path = format!("/surroundings/{}/{number}/film_w_per_m2_k", side.word());
                problems.push(Problem::warning(path, Trouble::Unusual {
                    words: format!("a film coefficient of {film} W/(m² K) is rare"),
                    hint: "Still air has 3 to 10, stirred water 500 to 3000, condensing steam 5000 to 15000."
                        .to_owned(),
                }));
            }
        }
    }
}

/// How far the temperatures of a layer leave the range of its material.
fn outside(item: &Item, number: usize, material: &Material) -> Option<Problem> {
    let (low, high) = expected(item, number)?;
    let (from, to) = material.range;
    let (by, end) = if high - to > from - low { (high - to, high) } else { (from - low, low) };
    (by > SLACK).then(|| {
        Problem::warning(
            format!("/item/layers/{number}/material"),
            Trouble::Unusual {
                words: format!(
                    "{} may come to {}; its properties are known from {} to {}",
                    material.name,
                    words::temperature(end),
                    words::temperature(from),
                    words::temperature(to),
                ),
                hint: "Outside that range they are held at its end.".to_owned(),
            },
        )
    })
}

/// Temperatures that a layer starts with, K. Between start and surroundings it can only come nearer to them,
/// and of an inner layer little is known beforehand, so the surroundings count for the outermost ones only.
fn expected(item: &Item, number: usize) -> Option<(f64, f64)> {
    let around = |low: f64, high: f64| (low <= high).then_some((low, high));
    match item.start() {
        Start::Uniform(temperature) => around(*temperature, *temperature),
        Start::PerLayer(all) => around(all[number], all[number]),
        Start::Profile(points) => {
            let all = points.iter().map(|point| point.1);
            let (low, high) =
                all.fold((f64::INFINITY, f64::NEG_INFINITY), |(low, high), t| (low.min(t), high.max(t)));
            around(low, high)
        }
        Start::SteadyBefore { contents, .. } => {
            let inside = (*contents).filter(|_| number == 0)?;
            around(inside, inside)
        }
    }
}
