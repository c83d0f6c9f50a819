//! Where a hand formula says that it holds, it agrees with the computed time: two ways that share nothing.

use stillheat::item::Condition;
use stillheat::scale::hand::{Gives, HandResult, formulas};

/// Items tried.
const ITEMS: usize = 250;

/// The most a formula that holds may be off: its limits (Biot number 0.1, Fourier number 0.2 and so on) let
/// through what adds up to about 8 %.
const OFF_AT_MOST: f64 = 0.1;

/// What nine of ten are off at most.
const OFF_NEARLY_ALWAYS: f64 = 0.04;

/// Numbers that look random and are the same every time: Knuth's linear congruential generator (1998, 3.3.4).
struct Draw(u64);

impl Draw {
    fn next(&mut self) -> u32 {
        self.0 = self.0.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        u32::try_from(self.0 >> 33).expect("31 bits")
    }

    fn unit(&mut self) -> f64 {
        f64::from(self.next()) / f64::from(1_u32 << 31)
    }

    fn below(&mut self, count: usize) -> usize {
        self.next() as usize % count
    }

    fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * self.unit()
    }

    /// Evenly over the logarithm.
    fn scaled(&mut self, low: f64, high: f64) -> f64 {
        low * libm::pow(high / low, self.unit())
    }

    fn one_of<'a>(&mut self, all: &[&'a str]) -> &'a str {
        all[self.below(all.len())]
    }

    fn layer(&mut self, number: usize) -> String {
        let (thickness, capacity, conductivity) = match number {
            0 => (self.scaled(0.01, 0.5), self.scaled(1e6, 4.5e6), self.scaled(0.1, 50.0)),
            1 => (self.scaled(0.002, 0.02), 3.8e6, self.scaled(15.0, 50.0)),
            _ => (self.scaled(0.02, 0.12), self.scaled(3e4, 1e6), self.scaled(0.03, 1.0)),
        };
        let mixed = if number == 0 && self.unit() < 0.3 {
            format!(r#", "motion": "stirred", "inside_film_w_per_m2_k": {}"#, self.scaled(30.0, 1000.0))
        } else {
            String::new()
        };
        let heat_capacity = capacity / 1000.0;
        format!(
            r#"{{"name": "layer {number}", "thickness_m": {thickness}, "density_kg_per_m3": 1000,
            "heat_capacity_j_per_kg_k": {heat_capacity}, "conductivity_w_per_m_k": {conductivity}{mixed}}}"#
        )
    }

    fn scenario(&mut self) -> String {
        let hollow = format!(r#""cylinder", "inner_radius_m": {}"#, self.between(0.1, 1.0));
        let shape = self.one_of(&[r#""slab""#, r#""cylinder""#, r#""sphere""#, &hollow]).to_owned();
        let count = 1 + self.below(3);
        let layers: Vec<String> = (0..count).map(|number| self.layer(number)).collect();
        let surroundings = self.between(0.0, 35.0);
        let start = surroundings + self.scaled(20.0, 700.0);
        let radiation = if self.unit() < 0.5 { self.between(0.1, 0.95) } else { 0.0 };
        let film = self.scaled(3.0, 200.0);
        let limit = surroundings + (start - surroundings) * self.scaled(0.03, 0.95);
        let watch = self.one_of(&[
            r#""what": "hottest", "of": "layer 0""#,
            r#""what": "coldest", "of": "layer 0""#,
            r#""what": "mean", "of": "layer 0""#,
            r#""what": "face", "of": "outer""#,
            r#""what": "hottest""#,
        ]);
        format!(
            r#"{{"stillheat": 1, "item": {{"shape": {shape}, "layers": [{}]}}, "start": {{"uniform_c": {start}}},
            "look_ahead_s": 3e8, "surroundings": {{"outer": [{{"temperature_c": {surroundings},
            "film_w_per_m2_k": {film}, "emissivity": {radiation}}}]}},
            "ready_when": [{{{watch}, "below_c": {limit}}}]}}"#,
            layers.join(", ")
        )
    }
}

#[test]
fn a_formula_that_holds_agrees_with_the_computed_time() {
    let mut draw = Draw(2026);
    let mut off: Vec<f64> = Vec::new();
    for _ in 0..ITEMS {
        let text = draw.scenario();
        let solved = stillheat::solve(&text).expect("the scenario can be solved");
        let condition: &Condition = &solved.checked.item.ready_when()[0];
        let Some(computed) = solved.resolved.followed[0].moments.first() else { continue };
        for result in formulas(&solved.checked.item, condition) {
            let HandResult { holds: true, gives: Gives::Time(time), .. } = result else { continue };
            let by = (time / computed.time - 1.0).abs();
            assert!(by < OFF_AT_MOST, "computed {} s, by hand {result:?}\n{text}", computed.time);
            off.push(by);
        }
    }
    assert!(off.len() > ITEMS / 3, "formulas hold often enough to be of use: {}", off.len());
    off.sort_by(f64::total_cmp);
    let nine_of_ten = off[off.len() * 9 / 10];
    assert!(nine_of_ten < OFF_NEARLY_ALWAYS, "{nine_of_ten}");
}

/// Odd but allowed: nothing to do, everything the same, fluxes against each other, no end.
const ODD: [&str; 8] = [
    r#""start": {"uniform_c": 20}, "surroundings": {"outer": [{"temperature_c": 20, "film_w_per_m2_k": 8}]}"#,
    r#""start": {"uniform_c": 60}, "surroundings": {}"#,
    r#""start": {"uniform_c": 60}, "surroundings": {"inner": [{"heat_flux_into_w_per_m2": 50}],
        "outer": [{"heat_flux_into_w_per_m2": -50}]}"#,
    r#""start": {"uniform_c": 60}, "surroundings": {"inner": [{"held_c": 80}], "outer": [{"held_c": 20}]}"#,
    r#""start": {"uniform_c": 60}, "surroundings": {"inner": [{"heat_flux_into_w_per_m2": -100000}],
        "outer": [{"temperature_c": 20, "emissivity": 0.5}]}"#,
    r#""start": {"uniform_c": 60}, "surroundings": {"outer": [{"temperature_c":
        {"mean_c": 60, "amplitude_k": 30, "period_s": 86400, "highest_at_s": 0}, "film_w_per_m2_k": 8}]}"#,
    r#""start": {"per_layer_c": [20, 90]}, "surroundings": {"outer": [{"temperature_c": 60,
        "film_w_per_m2_k": 8}]}"#,
    r#""start": {"steady_before": {"contents_c": 60, "outer": {"held_c": 60}}},
        "surroundings": {"outer": [{"held_c": 60}]}"#,
];

#[test]
fn no_formula_gives_nonsense_where_there_is_nothing_to_say() {
    let watched = [
        r#""what": "hottest", "below_c": 60"#,
        r#""what": "coldest", "above_c": 60"#,
        r#""what": "mean", "below_c": 59.999999999"#,
        r#""what": "face", "of": "outer", "above_c": 20"#,
        r#""what": "difference", "below_k": 1"#,
        r#""what": "rate", "below_k_per_h": 1"#,
        r#""what": "probe", "of": "p", "below_c": 60"#,
    ];
    for rest in ODD {
        for motion in ["still", "stirred"] {
            let film = if motion == "still" { "" } else { r#", "inside_film_w_per_m2_k": 100"# };
            let item = format!(
                r#"{{"shape": "slab", "layers": [{{"material": "water", "thickness_m": 0.1, "motion": "{motion}"{film}}},
                {{"material": "water", "thickness_m": 0.02}}]}}"#
            );
            let conditions = watched.map(|watch| format!("{{{watch}}}")).join(", ");
            let text = format!(
                r#"{{"stillheat": 1, "item": {item}, {rest}, "ready_when": [{conditions}],
                "probes": [{{"name": "p", "from_inside_m": 0.07}}]}}"#
            );
            let scenario = stillheat::scenario::read(&text).expect("it reads");
            let checked = stillheat::item::Item::check(&scenario).expect("it can be solved");
            for condition in checked.item.ready_when() {
                for result in formulas(&checked.item, condition) {
                    let sound = match result.gives {
                        Gives::Time(time) => time.is_finite() && time >= 0.0,
                        Gives::Temperature(value) | Gives::Never { settles_at: value } => value.is_finite(),
                    };
                    assert!(sound && !result.validity.contains("NaN"), "{result:?}\n{text}");
                }
            }
        }
    }
}
