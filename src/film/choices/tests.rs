use super::*;
use crate::matter::library::material;
use crate::units::kelvin;

/// Stefan and Boltzmann, W/(m² K⁴): CODATA 2018, exact to the digits given.
const SIGMA: f64 = 5.670_374_419e-8;

/// What the formulas need of a fluid, SI.
#[derive(Clone, Copy)]
struct Fluid {
    conductivity: f64,
    kinematic: f64,
    prandtl: f64,
    expansion: f64,
}

impl Fluid {
    fn new(id: &str, celsius: f64) -> Self {
        let material = material(id).expect(id);
        let t = kelvin(celsius);
        let density = material.density.value(t);
        let viscosity = material.viscosity.expect("viscosity").value(t);
        let conductivity = material.conductivity.value(t);
        Self {
            conductivity,
            kinematic: viscosity / density,
            prandtl: viscosity * material.heat_capacity.value(t) / conductivity,
            expansion: material.expansion.expect("expansion").value(t),
        }
    }

    /// The same with another dynamic viscosity.
    fn thickened(self, by: f64) -> Self {
        Self { kinematic: self.kinematic * by, prandtl: self.prandtl * by, ..self }
    }

    /// Churchill and Chu 1975, vertical plate, equation 9.
    fn at_rest(self, height: f64, difference: f64) -> f64 {
        let rayleigh = 9.81 * self.expansion * difference * height * height * height * self.prandtl
            / (self.kinematic * self.kinematic);
        let factor = libm::pow(1.0 + libm::pow(0.492 / self.prandtl, 9.0 / 16.0), 8.0 / 27.0);
        let root = 0.825 + 0.387 * libm::pow(rayleigh, 1.0 / 6.0) / factor;
        root * root * self.conductivity / height
    }

    /// Chilton, Drew and Jebens 1944, wall of a stirred vessel.
    fn stirred(self, vessel: f64, stirrer: f64, turns: f64) -> f64 {
        let reynolds = turns * stirrer * stirrer / self.kinematic;
        let nusselt = 0.36 * libm::pow(reynolds, 2.0 / 3.0) * libm::pow(self.prandtl, 1.0 / 3.0);
        nusselt * self.conductivity / vessel
    }

    /// Churchill and Bernstein 1977, cylinder in cross flow.
    fn across_a_cylinder(self, diameter: f64, speed: f64) -> f64 {
        let reynolds = speed * diameter / self.kinematic;
        let shape = libm::pow(1.0 + libm::pow(0.4 / self.prandtl, 2.0 / 3.0), 0.25);
        let wake = libm::pow(1.0 + libm::pow(reynolds / 282_000.0, 0.625), 0.8);
        let nusselt = 0.3 + 0.62 * reynolds.sqrt() * libm::pow(self.prandtl, 1.0 / 3.0) / shape * wake;
        nusselt * self.conductivity / diameter
    }

    /// Gnielinski 1976, turbulent pipe flow.
    fn through_a_pipe(self, diameter: f64, speed: f64) -> f64 {
        let reynolds = speed * diameter / self.kinematic;
        let root = 1.0 / (0.79 * libm::log(reynolds) - 1.64);
        let eighth = root * root / 8.0;
        let below = 1.0 + 12.7 * eighth.sqrt() * (libm::pow(self.prandtl, 2.0 / 3.0) - 1.0);
        eighth * (reynolds - 1_000.0) * self.prandtl / below * self.conductivity / diameter
    }
}

fn named(list: &[Choice], words: &str) -> Choice {
    let mut found = list.iter().filter(|choice| choice.words.starts_with(words));
    let choice = *found.next().expect(words);
    assert!(found.next().is_none(), "{words} begins more than one choice");
    choice
}

/// The ends of a choice are those of the formula, rounded as one would say them: within a quarter, as no
/// correlation of these is known better.
fn spans(choice: Choice, lowest: f64, highest: f64) {
    let near = |said: f64, computed: f64| said / computed > 0.8 && said / computed < 1.25;
    assert!(near(choice.low, lowest), "{}: low {} against {lowest}", choice.words, choice.low);
    assert!(near(choice.high, highest), "{}: high {} against {highest}", choice.words, choice.high);
    assert!(choice.likely > lowest && choice.likely < highest, "{}: {}", choice.words, choice.likely);
}

#[test]
fn every_choice_is_in_order_has_words_and_a_source() {
    for (list, least, most) in
        [(FILM, 0.1, 1e5), (INSIDE_FILM, 0.1, 1e5), (EMISSIVITY, 0.0, 1.0), (CONTACT, 0.0, 1.0)]
    {
        for (i, choice) in list.iter().enumerate() {
            assert!(least <= choice.low && choice.low <= choice.likely, "{}", choice.words);
            assert!(choice.likely <= choice.high && choice.high <= most, "{}", choice.words);
            assert!(choice.low < choice.high && !choice.source.is_empty(), "{}", choice.words);
            assert!(list[..i].iter().all(|other| other.words != choice.words), "{}", choice.words);
        }
    }
}

#[test]
fn a_film_towards_air_says_what_it_does_about_radiation() {
    for choice in FILM {
        let gas = ["air", "wind", "hall", "fan"].iter().any(|word| choice.words.contains(word))
            && !choice.words.contains("steam");
        let says = choice.words.contains("(convection only)")
            || choice.words.contains("radiation counted in (leave the emissivity empty)");
        assert_eq!(gas, says, "{}", choice.words);
    }
}

#[test]
fn still_air_is_that_of_the_free_convection_rules() {
    let wall = |difference: f64| 1.74 * libm::pow(difference, 1.0 / 3.0);
    let pipe = |difference: f64| 1.21 * libm::pow(difference, 1.0 / 3.0);
    let thin = |difference: f64, diameter: f64| 1.25 * libm::pow(difference / diameter, 0.25);
    spans(named(FILM, "still air indoors (conv"), pipe(10.0), wall(40.0));
    spans(named(FILM, "still air, surface"), pipe(100.0), wall(300.0));
    spans(named(FILM, "still air around"), thin(10.0, 0.1), thin(60.0, 0.02));
    let radiation = |emissivity: f64, celsius: f64| {
        let (hot, cold) = (kelvin(celsius), kelvin(20.0));
        emissivity * SIGMA * (hot * hot + cold * cold) * (hot + cold)
    };
    let painted = Fluid::new("air", 40.0).at_rest(1.0, 40.0) + radiation(0.9, 60.0);
    spans(named(FILM, "still air indoors, dull"), 1.0 / 0.13, painted);
    let bright = (pipe(10.0) + radiation(0.05, 30.0), wall(40.0) + radiation(0.3, 60.0));
    spans(named(FILM, "still air indoors, bright"), bright.0, bright.1);
}

#[test]
fn wind_and_fan_lie_between_their_rules() {
    let air = Fluid::new("air", 20.0);
    for (words, speed) in [("light wind", 2.0), ("fresh wind", 5.0), ("strong wind", 10.0)] {
        spans(named(FILM, words), air.across_a_cylinder(1.0, speed), 4.0 + 4.0 * speed);
    }
    let fan = (air.across_a_cylinder(1.0, 3.0), air.across_a_cylinder(0.1, 5.0));
    spans(named(FILM, "fan"), fan.0, fan.1);
    // ISO 6946 at 4 m/s: 20 by convection and 5 by radiation.
    let outdoors = named(FILM, "outdoors");
    assert!((outdoors.likely - (4.0 + 4.0 * 4.0 + 5.0)).abs() < 0.5);
}

#[test]
fn water_and_steam_outside_follow_their_formulas() {
    let rest = |celsius, difference| Fluid::new("water", celsius).at_rest(0.5, difference);
    spans(named(FILM, "water at rest"), rest(20.0, 2.0), rest(40.0, 40.0));
    let stirred = |stirrer, turns| Fluid::new("water", 20.0).stirred(1.0, stirrer, turns);
    spans(named(FILM, "stirred water"), stirred(0.4, 0.7), stirred(0.6, 2.0));
    let running = |speed| Fluid::new("water", 20.0).through_a_pipe(0.05, speed);
    spans(named(FILM, "running water"), running(0.3), running(1.5));
    // Nusselt's film on a wall 2 m high with 20 K, properties of water at 90 °C.
    let water = material("water").expect("water");
    let t = kelvin(90.0);
    let (rho, k) = (water.density.value(t), water.conductivity.value(t));
    let mu = water.viscosity.expect("viscosity").value(t);
    let film = 0.943 * (rho * rho * 9.81 * 2.257e6 * k * k * k / (mu * 20.0 * 2.0)).sqrt().sqrt();
    let steam = named(FILM, "condensing steam, no");
    assert!((steam.low / film - 1.0).abs() < 0.2, "{film}");
}

#[test]
fn contents_at_rest_follow_churchill_and_chu() {
    let film = |id, celsius, difference| Fluid::new(id, celsius).at_rest(1.0, difference);
    spans(
        named(INSIDE_FILM, "water or water-like, at rest"),
        film("water", 40.0, 0.5),
        film("water", 80.0, 10.0),
    );
    spans(named(INSIDE_FILM, "organic solvent, at"), film("toluene", 60.0, 0.5), film("toluene", 60.0, 10.0));
    let thin = (film("thermal-oil-mineral", 100.0, 0.5), film("thermal-oil-mineral", 200.0, 10.0));
    spans(named(INSIDE_FILM, "thin or hot oil (about"), thin.0, thin.1);
    let thick = Fluid::new("thermal-oil-mineral", 20.0);
    let ends = (thick.thickened(20.0).at_rest(1.0, 2.0), thick.at_rest(1.0, 10.0));
    spans(named(INSIDE_FILM, "thick oil (pours"), ends.0, ends.1);
    spans(named(INSIDE_FILM, "air or gas"), film("air", 60.0, 1.0), film("air", 60.0, 40.0));
}

#[test]
fn stirred_contents_follow_chilton_drew_and_jebens() {
    let ends = |fluid: Fluid| (fluid.stirred(1.0, 0.4, 0.7), fluid.stirred(1.0, 0.6, 2.0));
    let water = (ends(Fluid::new("water", 20.0)).0, ends(Fluid::new("water", 60.0)).1);
    spans(named(INSIDE_FILM, "water or water-like, stirred"), water.0, water.1);
    let solvent = ends(Fluid::new("toluene", 60.0));
    spans(named(INSIDE_FILM, "organic solvent, stirred"), solvent.0, solvent.1);
    let hot = ends(Fluid::new("thermal-oil-mineral", 100.0));
    spans(named(INSIDE_FILM, "thin or hot oil, stirred"), hot.0, hot.1);
    let cold = Fluid::new("thermal-oil-mineral", 20.0);
    spans(named(INSIDE_FILM, "thick oil, stirred"), ends(cold.thickened(20.0)).0, ends(cold).1);
}

#[test]
fn air_gaps_follow_iso_6946() {
    let dull = 1.0 / (2.0 / 0.9 - 1.0);
    let radiation = |celsius: f64| {
        let t = kelvin(celsius);
        4.0 * SIGMA * t * t * t
    };
    let conduction = |celsius| Fluid::new("air", celsius).conductivity;
    let gap = |width: f64, celsius, face| 1.0 / (conduction(celsius) / width + face * radiation(celsius));
    spans(named(CONTACT, "air gap, 1 mm"), gap(1e-3, 100.0, dull), gap(1e-3, 20.0, 0.05));
    spans(named(CONTACT, "air gap, 5 mm"), gap(5e-3, 100.0, dull), gap(5e-3, 20.0, 0.05));
    spans(named(CONTACT, "bricks"), gap(2e-4, 100.0, dull), gap(1e-3, 20.0, dull));
    let wide = |convection: f64, celsius, face| 1.0 / (convection + face * radiation(celsius));
    let more_than_5_k = 0.73 * libm::pow(20.0, 1.0 / 3.0);
    let upright = named(CONTACT, "air gap, 25 mm or more, upright, one");
    spans(upright, wide(more_than_5_k, 20.0, 0.05), wide(1.25, 20.0, 0.05));
    let plain = CONTACT.iter().find(|choice| choice.words.ends_with("25 mm or more, upright")).expect("gap");
    spans(*plain, wide(more_than_5_k, 100.0, dull), wide(1.25, 10.0, dull));
}
