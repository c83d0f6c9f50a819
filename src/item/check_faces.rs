//! What the faces see: rows in order, every quantity over time in SI.

use super::{Face, OverTime, Programme};
use crate::problem::{Problem, Trouble, figure};
use crate::scenario::limits::{TIME_STEP, apart};
use crate::scenario::{Number, OverTimeC, OverTimeFlux, WrittenFace};
use crate::units::kelvin;

/// The programme of a face; without rows it is insulated.
pub(super) fn face_programme(
    rows: &[WrittenFace],
    path: &str,
    problems: &mut Vec<Problem>,
) -> Option<Programme> {
    if rows.is_empty() {
        return Some(Programme::insulated());
    }
    let mut all = Vec::new();
    let mut before = None;
    for (number, row) in rows.iter().enumerate() {
        let from = begins(row, number, before, path, problems);
        let face = one_face(row, from, &format!("{path}/{number}"), problems);
        all.push(face.map(|face| (from, face)));
        before = Some(from);
    }
    let rows: Option<Vec<(f64, Face)>> = all.into_iter().collect();
    rows.map(|rows| Programme { rows })
}

/// When a row begins, s; written down as a problem where it does not follow the row before.
fn begins(
    row: &WrittenFace,
    number: usize,
    before: Option<f64>,
    path: &str,
    problems: &mut Vec<Problem>,
) -> f64 {
    let place = format!("{path}/{number}/from_s");
    match (row.from_s, before) {
        (Some(from), None) if from > 0.0 => {
            let words = format!("the first row begins at {} s; it must begin at 0", figure(from));
            problems.push(Problem::error(place, Trouble::Contradiction { words }));
            0.0
        }
        (_, None) => 0.0,
        (Some(from), Some(before)) => {
            if !apart(before, from, TIME_STEP) {
                let [from, before] = [from, before].map(figure);
                let words = format!(
                    "{from} s does not come after {before} s, where the row before begins, by at least {TIME_STEP} s"
                );
                problems.push(Problem::error(place, Trouble::Contradiction { words }));
            }
            from
        }
        (None, Some(before)) => {
            let what = "when this row begins, s after the stop".to_owned();
            problems.push(Problem::error(place, Trouble::Missing { what }));
            before
        }
    }
}

/// One row in SI. The reader has seen to it that exactly one kind is given.
pub(super) fn one_face(
    row: &WrittenFace,
    from: f64,
    path: &str,
    problems: &mut Vec<Problem>,
) -> Option<Face> {
    if let Some(held) = &row.held_c {
        return Some(Face::Held(temperature(held, from)));
    }
    if let Some(flux) = &row.heat_flux_into_w_per_m2 {
        return Some(Face::HeatFlux(heat_flux(flux, from)));
    }
    if let Some(surroundings) = &row.temperature_c {
        let emissivity = row.emissivity.map_or(0.0, Number::value);
        let film = row.film_w_per_m2_k.map_or(0.0, Number::value);
        if film == 0.0 && emissivity == 0.0 {
            return Some(Face::Insulated);
        }
        let own = temperature(surroundings, from);
        let radiation_to =
            row.radiation_to_c.as_ref().map_or_else(|| own.clone(), |to| temperature(to, from));
        return Some(Face::Exchange { film, temperature: own, emissivity, radiation_to });
    }
    if row.insulated == Some(true) {
        return Some(Face::Insulated);
    }
    let what = "what the face sees: insulated, held_c, heat_flux_into_w_per_m2 or temperature_c".to_owned();
    problems.push(Problem::error(path, Trouble::Missing { what }));
    None
}

fn temperature(written: &OverTimeC, from: f64) -> OverTime {
    match written {
        OverTimeC::Number(number) => OverTime::Constant(kelvin(number.value())),
        OverTimeC::Ramp { from_c, to_c, over_s } => ramp(kelvin(*from_c), kelvin(*to_c), from, *over_s),
        OverTimeC::Table { at_s, values_c, repeats_every_s } => table(
            at_s.iter().copied().zip(values_c.iter().map(|&value| kelvin(value))).collect(),
            *repeats_every_s,
        ),
        OverTimeC::Cycle { mean_c, amplitude_k, period_s, highest_at_s } => OverTime::Cycle {
            mean: kelvin(*mean_c),
            amplitude: *amplitude_k,
            period: *period_s,
            highest_at: *highest_at_s,
        },
    }
}

fn heat_flux(written: &OverTimeFlux, from: f64) -> OverTime {
    match written {
        OverTimeFlux::Number(number) => OverTime::Constant(number.value()),
        OverTimeFlux::Ramp { from_w_per_m2, to_w_per_m2, over_s } => {
            ramp(*from_w_per_m2, *to_w_per_m2, from, *over_s)
        }
        OverTimeFlux::Table { at_s, values_w_per_m2, repeats_every_s } => {
            table(at_s.iter().copied().zip(values_w_per_m2.iter().copied()).collect(), *repeats_every_s)
        }
        OverTimeFlux::Cycle { mean_w_per_m2, amplitude_w_per_m2, period_s, highest_at_s } => {
            OverTime::Cycle {
                mean: *mean_w_per_m2,
                amplitude: *amplitude_w_per_m2,
                period: *period_s,
                highest_at: *highest_at_s,
            }
        }
    }
}

/// From the start of its row on, then held.
fn ramp(first: f64, last: f64, from: f64, over: f64) -> OverTime {
    OverTime::Table(vec![(from, first), (from + over, last)])
}

fn table(points: Vec<(f64, f64)>, repeats: Option<f64>) -> OverTime {
    match repeats {
        Some(period) => OverTime::Repeating { points, period },
        None => OverTime::Table(points),
    }
}
