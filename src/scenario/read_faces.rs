//! What the faces see, as written.

use super::at::{At, Fields, SPREAD};
use super::limits as limit;
use super::types::{OverTimeC, OverTimeFlux, WrittenFace, WrittenSurroundings};
use crate::problem::{Limit, Trouble, figure, quantity, rounded};

pub(super) const SURROUNDINGS: &[&str] = &["inner", "outer"];
pub(super) const FACE: &[&str] = &[
    "from_s",
    "insulated",
    "held_c",
    "heat_flux_into_w_per_m2",
    "temperature_c",
    "film_w_per_m2_k",
    "emissivity",
    "radiation_to_c",
];

/// The kinds of surroundings; a row is of one.
pub(super) const KINDS: &[&str] = &["insulated", "held_c", "heat_flux_into_w_per_m2", "temperature_c"];

/// The keys of one quantity over time: ramp, table, cycle.
pub(super) struct Keys {
    pub ramp: &'static [&'static str],
    pub table: &'static [&'static str],
    pub cycle: &'static [&'static str],
    value: &'static Limit,
    amplitude: &'static Limit,
}

pub(super) static CELSIUS: Keys = Keys {
    ramp: &["from_c", "to_c", "over_s"],
    table: &["at_s", "values_c", "repeats_every_s"],
    cycle: &["mean_c", "amplitude_k", "period_s", "highest_at_s"],
    value: &limit::TEMPERATURE,
    amplitude: &limit::AMPLITUDE,
};

pub(super) static FLUX: Keys = Keys {
    ramp: &["from_w_per_m2", "to_w_per_m2", "over_s"],
    table: &["at_s", "values_w_per_m2", "repeats_every_s"],
    cycle: &["mean_w_per_m2", "amplitude_w_per_m2", "period_s", "highest_at_s"],
    value: &limit::HEAT_FLUX,
    amplitude: &limit::FLUX_AMPLITUDE,
};

/// A quantity over time that is not just a number.
enum Varying {
    Ramp { from: f64, to: f64, over: f64 },
    Table { at: Vec<f64>, values: Vec<f64>, repeats: Option<f64> },
    Cycle { mean: f64, amplitude: f64, period: f64, highest_at: f64 },
}

pub(super) fn surroundings(at: &At<'_>) -> Option<WrittenSurroundings> {
    let fields = at.fields("an object with inner and outer", SURROUNDINGS)?;
    let rows = |key| {
        let list = fields.get(key).and_then(|at| at.list("rows", 0, limit::ROWS)).unwrap_or_default();
        list.iter().map(face).collect()
    };
    Some(WrittenSurroundings { inner: rows("inner"), outer: rows("outer") })
}

/// A face of earlier surroundings, which have no beginning.
pub(super) fn earlier_face(at: &At<'_>) -> WrittenFace {
    if let Some(from) = at.member("from_s") {
        let words = "a steady state has no beginning; leave from_s out".to_owned();
        from.problem(Trouble::Contradiction { words });
    }
    face(at)
}

/// One that cannot be read says nothing.
fn face(at: &At<'_>) -> WrittenFace {
    let Some(fields) = at.fields("an object that says what the face sees", FACE) else {
        return WrittenFace::default();
    };
    let sound = one_kind(at);
    let celsius = |key| fields.get(key).map(|at| over_time_c(&at));
    let flux = fields.get("heat_flux_into_w_per_m2").map(|at| over_time_flux(&at));
    let (held, temperature, radiation) =
        (celsius("held_c"), celsius("temperature_c"), celsius("radiation_to_c"));
    let face = WrittenFace {
        from_s: fields.get("from_s").and_then(|at| at.number(&limit::TIME)),
        insulated: fields.get("insulated").and_then(|at| at.only_true()),
        held_c: held.flatten(),
        heat_flux_into_w_per_m2: flux.flatten(),
        temperature_c: temperature.flatten(),
        film_w_per_m2_k: fields.get("film_w_per_m2_k").and_then(|at| at.spread(&limit::FILM)),
        emissivity: fields.get("emissivity").and_then(|at| at.spread(&limit::EMISSIVITY)),
        radiation_to_c: radiation.flatten(),
    };
    if sound { face } else { WrittenFace { from_s: face.from_s, ..WrittenFace::default() } }
}

/// Exactly one kind of surroundings, and what belongs to it.
fn one_kind(at: &At<'_>) -> bool {
    let given: Vec<&str> = KINDS.iter().copied().filter(|key| at.has(key)).collect();
    let exchange = ["film_w_per_m2_k", "emissivity", "radiation_to_c"];
    let words = match given.as_slice() {
        [] if exchange.iter().any(|key| at.has(key)) => {
            "film_w_per_m2_k or emissivity without temperature_c; say how warm the surroundings are"
                .to_owned()
        }
        [] => format!("nothing says what the face sees; one of {}", KINDS.join(", ")),
        ["temperature_c"] if !at.has("film_w_per_m2_k") && !at.has("emissivity") => {
            "temperature_c needs film_w_per_m2_k or emissivity or both; held_c holds the face itself"
                .to_owned()
        }
        ["temperature_c"] if at.has("radiation_to_c") && !at.has("emissivity") => {
            "radiation_to_c without emissivity; say how well the face radiates".to_owned()
        }
        ["temperature_c"] => return true,
        [only] => match exchange.iter().find(|key| at.has(key)) {
            Some(other) => format!("{only} and {other} are both given; only one can hold at a face"),
            None => return true,
        },
        many => format!("{} are both given; only one can hold at a face", many.join(" and ")),
    };
    at.problem(Trouble::Contradiction { words });
    false
}

fn over_time_c(at: &At<'_>) -> Option<OverTimeC> {
    Some(match varying(at, &CELSIUS) {
        None => OverTimeC::Number(at.spread(&limit::TEMPERATURE)?),
        Some(varying) => match varying? {
            Varying::Ramp { from, to, over } => OverTimeC::Ramp { from_c: from, to_c: to, over_s: over },
            Varying::Table { at, values, repeats } => {
                OverTimeC::Table { at_s: at, values_c: values, repeats_every_s: repeats }
            }
            Varying::Cycle { mean, amplitude, period, highest_at } => OverTimeC::Cycle {
                mean_c: mean,
                amplitude_k: amplitude,
                period_s: period,
                highest_at_s: highest_at,
            },
        },
    })
}

fn over_time_flux(at: &At<'_>) -> Option<OverTimeFlux> {
    Some(match varying(at, &FLUX) {
        None => OverTimeFlux::Number(at.spread(&limit::HEAT_FLUX)?),
        Some(varying) => match varying? {
            Varying::Ramp { from, to, over } => {
                OverTimeFlux::Ramp { from_w_per_m2: from, to_w_per_m2: to, over_s: over }
            }
            Varying::Table { at, values, repeats } => {
                OverTimeFlux::Table { at_s: at, values_w_per_m2: values, repeats_every_s: repeats }
            }
            Varying::Cycle { mean, amplitude, period, highest_at } => OverTimeFlux::Cycle {
                mean_w_per_m2: mean,
                amplitude_w_per_m2: amplitude,
                period_s: period,
                highest_at_s: highest_at,
            },
        },
    })
}

#[allow(clippy::option_option, reason = "read or not, and whether it was sound, are two questions")]
/// None: it is a plain number or a spread. Some(None): it could not be read.
fn varying(at: &At<'_>, keys: &'static Keys) -> Option<Option<Varying>> {
    let has = |keys: &[&str]| keys.iter().any(|key| at.has(key));
    if !at.is_object() || has(SPREAD) {
        return None;
    }
    Some(if has(keys.table) {
        at.fields("a table over time", keys.table).and_then(|fields| table(&fields, keys))
    } else if has(keys.cycle) {
        at.fields("a cycle", keys.cycle).and_then(|fields| cycle(&fields, keys))
    } else if has(keys.ramp) {
        at.fields("a ramp", keys.ramp).and_then(|fields| ramp(&fields, keys))
    } else {
        let [ramp, table, cycle] = [keys.ramp, keys.table, keys.cycle].map(|keys| keys.join(", "));
        let words = format!(
            "an object here is a number (value, low, high), a ramp ({ramp}), a table ({table}) or a cycle ({cycle})"
        );
        at.problem(Trouble::Contradiction { words });
        None
    })
}

fn ramp(fields: &Fields<'_>, keys: &Keys) -> Option<Varying> {
    let from = fields.needed(keys.ramp[0], "where the ramp begins").and_then(|at| at.number(keys.value));
    let to = fields.needed(keys.ramp[1], "where the ramp ends").and_then(|at| at.number(keys.value));
    let over =
        fields.needed(keys.ramp[2], "how long the ramp takes").and_then(|at| at.number(&limit::DURATION));
    Some(Varying::Ramp { from: from?, to: to?, over: over? })
}

fn table(fields: &Fields<'_>, keys: &Keys) -> Option<Varying> {
    let times = fields
        .needed(keys.table[0], "the times of the table")
        .and_then(|at| at.ascending("times", limit::TABLE_POINTS, &limit::TIME, limit::TIME_STEP));
    let values = fields
        .needed(keys.table[1], "a value for each time")
        .and_then(|at| at.numbers("values", 2, limit::TABLE_POINTS, keys.value));
    let repeats = fields.get(keys.table[2]);
    let period = repeats.as_ref().and_then(|at| at.number(&limit::PERIOD));
    let (times, values) = (times?, values?);
    if !fields.at().same_length(keys.table[0], times.len(), keys.table[1], values.len()) {
        return None;
    }
    let length = times[times.len() - 1] - times[0];
    if let (Some(at), Some(period)) = (&repeats, period)
        && period < length
    {
        let (period, length) = (figure(period), figure(length));
        let words = format!("a period of {period} s is shorter than its table of {length} s");
        at.problem(Trouble::Contradiction { words });
    }
    Some(Varying::Table { at: times, values, repeats: period })
}

fn cycle(fields: &Fields<'_>, keys: &Keys) -> Option<Varying> {
    let mean = fields.needed(keys.cycle[0], "the mean").and_then(|at| at.number(keys.value));
    let amplitude =
        fields.needed(keys.cycle[1], "half of highest minus lowest").and_then(|at| at.number(keys.amplitude));
    let period = fields
        .needed(keys.cycle[2], "the period; a day has 86400 s")
        .and_then(|at| at.number(&limit::PERIOD));
    let highest_at =
        fields.needed(keys.cycle[3], "when it is highest").and_then(|at| at.number(&limit::WHEN));
    let (mean, amplitude, period, highest_at) = (mean?, amplitude?, period?, highest_at?);
    let extremes = [("falls", rounded(mean - amplitude)), ("rises", rounded(mean + amplitude))];
    if let Some((verb, extreme)) = extremes.into_iter().find(|(_, extreme)| !keys.value.holds(*extreme)) {
        let words = format!("it {verb} to {}; {}", quantity(extreme, keys.value.unit), keys.value);
        let at = fields.get(keys.cycle[1]).unwrap_or_else(|| fields.at().clone());
        at.problem(Trouble::Contradiction { words });
        return None;
    }
    Some(Varying::Cycle { mean, amplitude, period, highest_at })
}
