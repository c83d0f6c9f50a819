//! A liquid that is said to lie still: does it, and how wrong is that if not?

use super::resolve::resolve;
use super::verdict::{Verdict, all_of, any_of};
use super::{Resolved, words};
use crate::item::{Item, Motion, Shape};
use crate::matter::library::Material;
use crate::problem::{Problem, Trouble};
use crate::scale::mixing::{Liquid, Mixing, natural_film};
use crate::units::clock::Clock;

/// Difference between a liquid and its wall taken to judge its motion, K: small against most starts, so that a
/// liquid that mixes here mixes for nearly all of the time. Common practice, no source.
const DIFFERENCE: f64 = 2.0;

/// A warning for each still liquid that does not lie still, with what the answer would be if it mixed itself.
pub fn warnings(
    item: &Item,
    liquids: &[(usize, Material)],
    resolved: &Resolved,
    clock: Option<Clock>,
) -> Vec<Problem> {
    liquids.iter().filter_map(|(layer, material)| warning(item, *layer, material, resolved, clock)).collect()
}

fn warning(
    item: &Item,
    layer: usize,
    material: &Material,
    resolved: &Resolved,
    clock: Option<Clock>,
) -> Option<Problem> {
    let liquid = liquid(material, hottest_at_start(resolved, layer))?;
    let half_width = half_width(item, layer);
    let rayleigh = liquid.rayleigh(half_width, DIFFERENCE);
    let mixing = Mixing::at(rayleigh);
    if mixing == Mixing::Conducts {
        return None;
    }
    let film = natural_film(&liquid, 2.0 * half_width, DIFFERENCE);
    let other = resolve(&item.with_motion(layer, Motion::Mixed { film })).ok()?;
    let name = &item.layers()[layer].name;
    let answers = compare(item, resolved, &other, clock);
    Some(Problem::warning(
        format!("/item/layers/{layer}/motion"),
        Trouble::Unusual {
            words: format!(
                "{name} is a liquid set to still, but with a Rayleigh number of {rayleigh:.0e} {}{answers}",
                mixing.words()
            ),
            hint: format!(
                "Set its motion to self-mixing; a film of about {film:.0} W/(m² K) follows from Churchill and Chu 1975."
            ),
        },
    ))
}

fn liquid(material: &Material, at: f64) -> Option<Liquid> {
    Some(Liquid {
        density: material.density.value(at),
        heat_capacity: material.heat_capacity.value(at),
        conductivity: material.conductivity.value(at),
        viscosity: material.viscosity.as_ref()?.value(at),
        expansion: material.expansion.as_ref()?.value(at),
    })
}

fn hottest_at_start(resolved: &Resolved, layer: usize) -> f64 {
    use crate::item::{Region, Watch};
    resolved.coarse.history.watch(&Watch::Hottest(Region::Layer(layer)), 0.0)
}

/// From the middle of the liquid to its wall, m.
fn half_width(item: &Item, layer: usize) -> f64 {
    let thickness = item.layers()[layer].thickness;
    let core = layer == 0 && item.shape() != Shape::Slab && !item.shape().has_inner_face();
    if core { thickness } else { 0.5 * thickness }
}

/// "; taken so, it would be ready Tuesday 14:20 instead of Saturday 13:09"
fn compare(item: &Item, still: &Resolved, mixed: &Resolved, clock: Option<Clock>) -> String {
    let count = item.ready_when().len();
    let time = |resolved: &Resolved| {
        let (ready, limits) = resolved.followed.split_at(count);
        let verdict = if ready.is_empty() {
            any_of(limits, resolved.coarse.ending)
        } else {
            all_of(ready, resolved.coarse.ending)
        };
        match verdict {
            Verdict::At { moment, .. } => Some(moment.time),
            Verdict::Already { .. } | Verdict::Never | Verdict::NotWithin => None,
        }
    };
    match (time(mixed), time(still)) {
        (Some(mixed), Some(still)) => {
            format!(
                "; taken so, the answer is {} instead of {}",
                words::when(mixed, clock),
                words::when(still, clock)
            )
        }
        _ => String::new(),
    }
}
