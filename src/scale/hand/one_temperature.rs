//! One temperature throughout, applied to an item.

use super::around::Around;
use super::body::{Body, Course};
use super::surroundings;
use super::verdict::{Found, Verdict, figure, percent};
use super::view::View;
use super::{Gives, reached};
use crate::item::{Condition, Motion, Watch};
use crate::scale::chain::Outside;
use crate::scale::numbers::{LUMPED_BELOW, biot, characteristic_length};
use crate::scale::roots::bisect;

const NAME: &str = "one temperature throughout";
const BY_FILM: &str = "t = C R ln((T start - T surroundings) / (T limit - T surroundings)), C = sum of heat \
    capacities, R = sum of resistances from the contents to the surroundings (Newton's law of cooling; \
    Incropera et al. 2007, eq. 5.5; layers around the contents by Rayleigh 1877)";
const BY_RADIATION: &str = "t = C / (4 eps sigma A Ts^3) (ln|(Ts + T) / (Ts - T)| + 2 arctan(T / Ts)), from T start \
    to T limit, Ts = temperature radiated to (Incropera et al. 2007, eq. 5.18)";
const BY_BOTH: &str = "t = integral of C dT / Q from T limit to T start, Q = heat lost by film and radiation through \
    the resistances of the layers (separation of variables; Incropera et al. 2007, eq. 5.15; layers around the \
    contents by Rayleigh 1877)";
const DRIVEN: &str = "t = C (T limit - T start) / Q, Q = heat put in (any heat-transfer text)";

/// What differs inside may shift the time by this part.
const INSIDE_BELOW: f64 = 0.08;

/// A flux may put up to this part of the change across the body.
const ACROSS_BELOW: f64 = 0.1;

/// Properties may vary by this part; their mean is taken.
const VARIES_BELOW: f64 = 0.2;

/// Where and when the body arrives.
#[derive(Clone, Copy)]
struct Arrival {
    /// K
    temperature: f64,
    /// s
    time: f64,
}

/// The formula for a condition; none where it has nothing to say.
pub fn one_temperature(view: &View<'_>, condition: &Condition) -> Option<Found> {
    if matches!(condition.watch, Watch::Difference(_)) {
        return None;
    }
    let body = Body::new(view, condition)?;
    let begin = body.watched(condition.watch, body.start);
    if reached(condition, begin) {
        // Reached while the layers around settle in, of which this formula knows nothing.
        return None;
    }
    let Some(settles) = body.settles else {
        return driven(&body, view, condition, begin);
    };
    let end = body.watched(condition.watch, settles);
    if !reached(condition, end) {
        return Some(verdict(&body, view, condition, None).found(
            NAME,
            formula(&body),
            Gives::Never { settles_at: end },
        ));
    }
    let at = |part: f64| body.start + (settles - body.start) * part;
    let part = bisect(0.0, 1.0, |part| {
        if reached(condition, body.watched(condition.watch, at(part))) { 1.0 } else { -1.0 }
    });
    Some(arrives(
        &body,
        view,
        condition,
        Arrival { temperature: at(part), time: body.time(at(part), settles) },
    ))
}

/// Nothing draws: a given flux drives the body steadily, or nothing does.
fn driven(body: &Body<'_>, view: &View<'_>, condition: &Condition, begin: f64) -> Option<Found> {
    if body.lost(body.start) == 0.0 {
        let never = Gives::Never { settles_at: begin };
        return Some(verdict(body, view, condition, None).found(NAME, DRIVEN, never));
    }
    let temperature = body.start + condition.limit - begin;
    let time = body.time(temperature, temperature);
    let rate = matches!(condition.watch, Watch::Rate(_));
    (time > 0.0 && !rate).then(|| arrives(body, view, condition, Arrival { temperature, time }))
}

fn formula(body: &Body<'_>) -> &'static str {
    match body.course() {
        Course::Driven => DRIVEN,
        Course::ByFilm => BY_FILM,
        Course::ByRadiation { .. } => BY_RADIATION,
        Course::ByBoth => BY_BOTH,
    }
}

fn arrives(body: &Body<'_>, view: &View<'_>, condition: &Condition, arrival: Arrival) -> Found {
    let mut verdict = verdict(body, view, condition, Some(arrival));
    let Arrival { temperature, time } = arrival;
    let around = Around {
        hold: body.around,
        lag: view.lag(body.layer),
        time,
        decays: body.decays(temperature),
        watched: view.watches_others(condition.watch, body.layer),
    };
    around.judge(&mut verdict);
    verdict.object(view.begins_low(condition.watch));
    verdict.found(NAME, formula(body), Gives::Time(time))
}

/// What speaks for and against it, whether it arrives or not.
fn verdict(body: &Body<'_>, view: &View<'_>, condition: &Condition, arrival: Option<Arrival>) -> Verdict {
    let mut verdict = Verdict::new();
    if body.layout.layers()[body.layer].motion == Motion::Still {
        even_inside(body, view, condition, arrival, &mut verdict);
        flux_across(body, view, arrival, &mut verdict);
    } else {
        verdict.say(true, "the contents are mixed".to_owned());
    }
    for (what, varies) in [
        ("its heat capacity", view.capacity_varies(body.layer)),
        ("the resistance around it", view.resistance_varies(&body.chain, body.layer)),
    ] {
        verdict.unless(varies < VARIES_BELOW, || format!("{what} varies by {}", percent(varies)));
        verdict.doubt(0.1 * varies);
    }
    let to = arrival.map(|arrival| arrival.temperature).or(body.settles).unwrap_or(body.start);
    let start = &view.start[body.layer];
    let uneven = start.spread > 0.1 * (start.mean - to).abs();
    verdict.mention(uneven.then(|| "the start is not uniform: its mean is counted".to_owned()));
    let time = arrival.map_or(f64::INFINITY, |arrival| arrival.time);
    let span = (body.start - body.settles.unwrap_or(to)).abs();
    verdict.object(surroundings::not_counted(view.item(), time, span));
    verdict
}

/// Is it even inside, by the Biot number?
fn even_inside(
    body: &Body<'_>,
    view: &View<'_>,
    condition: &Condition,
    arrival: Option<Arrival>,
    verdict: &mut Verdict,
) {
    let sides = (0..2).filter(|&side| body.chain.ends[side].outside.draws());
    let area: f64 = sides.map(|side| body.layout.side_area(body.layer, side)).sum();
    if area == 0.0 {
        return;
    }
    let conductance: f64 = body.chain.conductances(body.node, body.start).iter().sum();
    let length = characteristic_length(body.layout.volume(body.layer), area);
    let number = biot(conductance / area, length, view.conductivities[body.layer]);
    let than = if number < LUMPED_BELOW { "below" } else { "not below" };
    verdict.say(number < LUMPED_BELOW, format!("Biot number {}, {than} {LUMPED_BELOW}", figure(number)));
    if let Some(Arrival { temperature, .. }) = arrival {
        let decays = body.decays(temperature);
        let off = off_inside(condition.watch, number, decays) + shifted(body, view, temperature) / decays;
        verdict.unless(number >= LUMPED_BELOW || off < INSIDE_BELOW, || {
            "the differences inside it count here".to_owned()
        });
        verdict.doubt(off);
    }
}

/// How far the time is off for what differs inside: of a mean 0.6 Bi, the sphere's; of a centre or face as much
/// as 0.9 Bi of the difference itself. Slab and cylinder have less (expansions of the first term for small Bi).
fn off_inside(watch: Watch, biot: f64, decays: f64) -> f64 {
    match watch {
        Watch::Mean(_) | Watch::Rate(_) => 0.6 * biot,
        Watch::Hottest(_) | Watch::Coldest(_) | Watch::Place(_) | Watch::Face(_) | Watch::Difference(_) => {
            0.6 * biot + 0.9 * biot / decays
        }
    }
}

/// How far the temperature where it settles lies beside the true mean, against what is left of the way.
fn shifted(body: &Body<'_>, view: &View<'_>, to: f64) -> f64 {
    body.settles.map_or(0.0, |settles| {
        let truly = view.settles[body.layer];
        (settles - truly).abs() / (to - settles).abs().min((to - truly).abs())
    })
}

/// What a given flux puts across it.
fn flux_across(body: &Body<'_>, view: &View<'_>, arrival: Option<Arrival>, verdict: &mut Verdict) {
    let thickness = body.layout.layers()[body.layer].thickness;
    let change = arrival.map_or(f64::INFINITY, |arrival| (arrival.temperature - body.start).abs());
    for end in body.chain.ends {
        match end.outside {
            Outside::Given(flux) if flux != 0.0 => {
                let across = (flux * thickness / (2.0 * view.conductivities[body.layer])).abs();
                verdict.say(across < ACROSS_BELOW * change, format!("the flux puts {across:.1} K across it"));
                verdict.doubt(across / change);
            }
            Outside::Given(_) | Outside::Held(_) | Outside::Exchange { .. } => {}
        }
    }
}
