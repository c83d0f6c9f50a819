//! What the faces see: at the stop, in the long run, and whether that changes before an answer is reached.

use crate::item::{Face, Item, OverTime, Programme, Side};
use crate::scale::chain::{End, Outside};
use crate::scale::outline;
use crate::units::words;

/// Changes of the surroundings below this part of the temperature difference are not worth a word.
const WORTH_A_WORD: f64 = 0.02;

/// Moments looked at between the stop and the answer.
const LOOKS: u32 = 24;

/// What the inner and the outer face see at the stop.
pub fn now(item: &Item) -> [End; 2] {
    ends(item, |programme| outside(&programme.rows[0].1, |course| course.at(0.0).0))
}

/// What they see in the long run: the last row, at the end of its tables, or the mean of what repeats.
pub fn in_the_long_run(item: &Item) -> [End; 2] {
    ends(item, |programme| outside(&programme.rows[programme.rows.len() - 1].1, long_run))
}

/// What two given faces see at time 0.
pub fn of_faces(item: &Item, inner: &Face, outer: &Face) -> [End; 2] {
    let at_once = |face: &Face| outside(face, |course| course.at(0.0).0);
    at_ends(item, [at_once(inner), at_once(outer)])
}

/// Do the faces see something that goes on changing for ever?
pub fn go_on_changing(item: &Item) -> bool {
    [Side::Inner, Side::Outer].into_iter().any(|side| {
        let rows = &item.face(side).rows;
        courses(&rows[rows.len() - 1].1).iter().any(|course| course.is_periodic())
    })
}

/// Does a later row change what a face sees?
pub fn change_later(item: &Item) -> bool {
    [Side::Inner, Side::Outer].into_iter().any(|side| item.face(side).rows.len() > 1)
}

/// What changes of the surroundings a formula with constant ones leaves out until a time (s), if any that
/// matter against a temperature difference `span` (K).
pub fn not_counted(item: &Item, until: f64, span: f64) -> Option<String> {
    let until = until.min(item.look_ahead());
    [Side::Inner, Side::Outer].into_iter().find_map(|side| {
        let rows = &item.face(side).rows;
        if let Some((from, _)) = rows.get(1)
            && *from < until
        {
            return Some(format!("surroundings change at {}: not counted", words::duration(*from)));
        }
        courses(&rows[0].1).into_iter().find_map(|course| {
            let begin = course.at(0.0).0;
            let against = if matches!(rows[0].1, Face::HeatFlux(_)) { begin.abs() } else { span };
            let change = (1..=LOOKS)
                .map(|i| (course.at(until * f64::from(i) / f64::from(LOOKS)).0 - begin).abs())
                .fold(0.0, f64::max);
            (change > WORTH_A_WORD * against)
                .then(|| "surroundings vary on the way: their value at the stop is counted".to_owned())
        })
    })
}

fn ends(item: &Item, sees: impl Fn(&Programme) -> Outside) -> [End; 2] {
    at_ends(item, [sees(item.face(Side::Inner)), sees(item.face(Side::Outer))])
}

fn at_ends(item: &Item, [inner, outer]: [Outside; 2]) -> [End; 2] {
    let (shape, radius) = (item.shape(), item.shape().inner_radius());
    let inner = if shape.has_inner_face() { inner } else { Outside::Given(0.0) };
    [
        End { outside: inner, area: outline::area(shape, radius) },
        End { outside: outer, area: outline::area(shape, radius + item.thickness()) },
    ]
}

fn outside(face: &Face, value: impl Fn(&OverTime) -> f64) -> Outside {
    match face {
        Face::Insulated => Outside::Given(0.0),
        Face::Held(temperature) => Outside::Held(value(temperature)),
        Face::HeatFlux(flux) => Outside::Given(value(flux)),
        Face::Exchange { film, temperature, emissivity, radiation_to } => Outside::Exchange {
            film: *film,
            temperature: value(temperature),
            emissivity: *emissivity,
            radiation_to: value(radiation_to),
        },
    }
}

/// The courses over time that matter for a face.
fn courses(face: &Face) -> Vec<&OverTime> {
    match face {
        Face::Insulated => vec![],
        Face::Held(course) | Face::HeatFlux(course) => vec![course],
        Face::Exchange { film, temperature, emissivity, radiation_to } => {
            let by_film = (*film > 0.0).then_some(temperature);
            let by_radiation = (*emissivity > 0.0).then_some(radiation_to);
            by_film.into_iter().chain(by_radiation).collect()
        }
    }
}

/// The value in the long run.
fn long_run(course: &OverTime) -> f64 {
    match course {
        OverTime::Constant(value) => *value,
        OverTime::Table(points) => points[points.len() - 1].1,
        OverTime::Repeating { points, period } => {
            let lines: f64 =
                points.windows(2).map(|pair| 0.5 * (pair[0].1 + pair[1].1) * (pair[1].0 - pair[0].0)).sum();
            let (first, last) = (points[0], points[points.len() - 1]);
            let closing = 0.5 * (first.1 + last.1) * (first.0 + period - last.0);
            (lines + closing) / period
        }
        OverTime::Cycle { mean, .. } => *mean,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn the_long_run_is_the_end_of_a_table_and_the_mean_of_what_repeats() {
        let points = vec![(0.0, 290.0), (10.0, 300.0), (20.0, 300.0)];
        assert_relative_eq!(long_run(&OverTime::Table(points.clone())), 300.0);
        // 295 for 10 s, 300 for 10 s, then 20 s back down: 295.
        let repeating = OverTime::Repeating { points, period: 40.0 };
        assert_relative_eq!(long_run(&repeating), 296.25);
    }
}
