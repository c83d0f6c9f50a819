//! Layers in series: heat flow and temperatures along a chain of nodes while nothing is stored on the way.

use super::numbers::STEFAN_BOLTZMANN;
use super::roots::bisect;

/// Hotter than this, K, nothing settles.
const HOTTEST: f64 = 1e5;

/// Colder than this, K, nothing settles.
const COLDEST: f64 = 1e-3;

/// Newton's method converges from the hot side here, in a handful of rounds; a limit all the same.
const ROUNDS: usize = 60;

/// What a face sees at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Outside {
    /// This heat flux into the item, W/m²; 0 where insulated.
    Given(f64),
    /// The face has this temperature, K.
    Held(f64),
    /// Film and radiation.
    Exchange {
        /// W/(m² K)
        film: f64,
        /// K
        temperature: f64,
        /// 0 to 1
        emissivity: f64,
        /// K
        radiation_to: f64,
    },
}

impl Outside {
    /// Does it draw the face towards a temperature?
    pub fn draws(self) -> bool {
        !matches!(self, Self::Given(_))
    }

    /// Lowest and highest temperature it draws towards, K.
    pub fn extent(self) -> Option<(f64, f64)> {
        match self {
            Self::Given(_) => None,
            Self::Held(to) => Some((to, to)),
            Self::Exchange { film, temperature, emissivity, radiation_to } => Some(if emissivity == 0.0 {
                (temperature, temperature)
            } else if film == 0.0 {
                (radiation_to, radiation_to)
            } else {
                (temperature.min(radiation_to), temperature.max(radiation_to))
            }),
        }
    }

    /// Film coefficient that counts radiation in, W/(m² K), and the temperature of the surroundings that goes
    /// with it, K, for a face at a temperature; none where nothing draws. Infinite for a held face.
    ///
    /// Source: `eps sigma (T⁴ - Tr⁴) = eps sigma (T² + Tr²)(T + Tr) (T - Tr)`, any heat-transfer text.
    pub fn as_film(self, face: f64) -> Option<(f64, f64)> {
        match self {
            Self::Given(_) => None,
            Self::Held(to) => Some((f64::INFINITY, to)),
            Self::Exchange { film, temperature, emissivity, radiation_to } => {
                let to = radiation_to;
                let radiation = emissivity * STEFAN_BOLTZMANN * (face * face + to * to) * (face + to);
                let both = film + radiation;
                Some((both, (film * temperature + radiation * to) / both))
            }
        }
    }

    /// Heat flux out of a face at a temperature and its derivative, W/m² and W/(m² K); of a held face none.
    fn out(self, face: f64) -> (f64, f64) {
        match self {
            Self::Given(flux) => (-flux, 0.0),
            Self::Held(_) => (0.0, 0.0),
            Self::Exchange { film, temperature, emissivity, radiation_to } => {
                let radiation = emissivity * STEFAN_BOLTZMANN;
                let (cube, to) = (face * face * face, radiation_to);
                (
                    film * (face - temperature) + radiation * (cube * face - to * to * to * to),
                    film + 4.0 * radiation * cube,
                )
            }
        }
    }
}

/// One end of the chain.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct End {
    /// What its face sees.
    pub outside: Outside,
    /// Area of its face, m².
    pub area: f64,
}

impl End {
    /// Temperature of the face behind a resistance (K/W) from a node at a temperature, K.
    pub fn face(&self, resistance: f64, node: f64) -> f64 {
        match self.outside {
            Outside::Held(to) => to,
            Outside::Given(flux) => node + flux * self.area * resistance,
            Outside::Exchange { .. } if resistance == 0.0 => node,
            Outside::Exchange { .. } => {
                let hottest = self.outside.extent().map_or(node, |extent| extent.1.max(node));
                let through = resistance * self.area;
                let mut face = hottest;
                for _ in 0..ROUNDS {
                    let (out, slope) = self.outside.out(face);
                    let next = face + (node - face - through * out) / (1.0 + through * slope);
                    if next >= face {
                        break;
                    }
                    face = next;
                }
                face
            }
        }
    }

    /// Heat out through this end from a node at a temperature, W; 0 from a node that a held face holds.
    fn flow(&self, resistance: f64, node: f64) -> f64 {
        match self.outside {
            // A node that the face holds: what flows is not to be seen from here.
            Outside::Held(_) if resistance == 0.0 => 0.0,
            Outside::Held(to) => (node - to) / resistance,
            Outside::Given(_) | Outside::Exchange { .. } => {
                self.area * self.outside.out(self.face(resistance, node)).0
            }
        }
    }

    /// Heat per kelvin between a node at a temperature and the surroundings, W/K; 0 where nothing draws.
    fn conductance(&self, resistance: f64, node: f64) -> f64 {
        let film = self.outside.as_film(self.face(resistance, node));
        film.map_or(0.0, |(film, _)| 1.0 / (resistance + 1.0 / (self.area * film)))
    }

    /// Resistance from the face on, K/W, for small changes about a face temperature.
    fn beyond(&self, face: f64) -> f64 {
        match self.outside {
            Outside::Held(_) => 0.0,
            Outside::Given(_) => f64::INFINITY,
            Outside::Exchange { .. } => 1.0 / (self.area * self.outside.out(face).1),
        }
    }
}

/// Nodes from the inside out, resistances between neighbours, and what the two ends see.
#[derive(Clone, Debug, PartialEq)]
pub struct Chain {
    /// K/W from each node to the next, one fewer than nodes.
    pub to_next: Vec<f64>,
    /// Inner and outer end.
    pub ends: [End; 2],
}

impl Chain {
    /// Resistance between a node and the inner and the outer face, K/W.
    pub fn resistances(&self, node: usize) -> [f64; 2] {
        [self.to_next[..node].iter().sum(), self.to_next[node..].iter().sum()]
    }

    /// The temperature at which a node is held by a face that it touches, K.
    pub fn pinned(&self, node: usize) -> Option<f64> {
        self.ends.iter().zip(self.resistances(node)).find_map(|(end, resistance)| match end.outside {
            Outside::Held(to) if resistance == 0.0 => Some(to),
            Outside::Held(_) | Outside::Given(_) | Outside::Exchange { .. } => None,
        })
    }

    /// Heat out of a node at a temperature through the inner and the outer face, W.
    pub fn flows(&self, node: usize, temperature: f64) -> [f64; 2] {
        let [inner, outer] = self.resistances(node);
        [self.ends[0].flow(inner, temperature), self.ends[1].flow(outer, temperature)]
    }

    /// Heat per kelvin between a node at a temperature and the inner and the outer surroundings, W/K.
    pub fn conductances(&self, node: usize, temperature: f64) -> [f64; 2] {
        let [inner, outer] = self.resistances(node);
        [self.ends[0].conductance(inner, temperature), self.ends[1].conductance(outer, temperature)]
    }

    /// The temperature at which as much comes as goes; none where nothing draws or where it would be absurd.
    pub fn settles(&self, node: usize) -> Option<f64> {
        if let Some(held) = self.pinned(node) {
            return Some(held);
        }
        let extents = self.ends.iter().filter_map(|end| end.outside.extent());
        let (mut low, mut high) = extents.reduce(|a, b| (a.0.min(b.0), a.1.max(b.1)))?;
        let out = |temperature: f64| self.flows(node, temperature).iter().sum::<f64>();
        while out(high) < 0.0 {
            high *= 2.0;
            if high > HOTTEST {
                return None;
            }
        }
        while out(low) > 0.0 {
            low *= 0.5;
            if low < COLDEST {
                return None;
            }
        }
        Some(if low < high { bisect(low, high, out) } else { low })
    }

    /// Temperature of every node, K, while `node` has one.
    pub fn temperatures(&self, node: usize, temperature: f64) -> Vec<f64> {
        let [inwards, outwards] = self.flows(node, temperature);
        self.from(node, temperature, [inwards, outwards])
    }

    /// How far each node follows a small change of `node`, 0 to 1.
    pub fn shares(&self, node: usize, temperature: f64) -> Vec<f64> {
        let resistances = self.resistances(node);
        let per_ohm = |side: usize| {
            let end = &self.ends[side];
            1.0 / (resistances[side] + end.beyond(end.face(resistances[side], temperature)))
        };
        self.from(node, 1.0, [per_ohm(0), per_ohm(1)])
    }

    /// Values along the chain that fall away from `node` with these flows.
    fn from(&self, node: usize, value: f64, flows: [f64; 2]) -> Vec<f64> {
        let mut all = vec![value; self.to_next.len() + 1];
        for i in (0..node).rev() {
            all[i] = all[i + 1] - flows[0] * self.to_next[i];
        }
        for i in node..self.to_next.len() {
            all[i + 1] = all[i] - flows[1] * self.to_next[i];
        }
        all
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    const CLOSED: End = End { outside: Outside::Given(0.0), area: 1.0 };

    fn exchange(film: f64, temperature: f64, emissivity: f64) -> End {
        let outside = Outside::Exchange { film, temperature, emissivity, radiation_to: temperature };
        End { outside, area: 2.0 }
    }

    #[test]
    fn two_films_divide_the_difference_by_their_resistances() {
        let chain =
            Chain { to_next: vec![0.3, 0.1], ends: [exchange(5.0, 400.0, 0.0), exchange(1.0, 300.0, 0.0)] };
        // 0.1 + 0.3 + 0.1 + 0.5 = 1 K/W: 100 W.
        assert_relative_eq!(chain.settles(1).unwrap(), 360.0, max_relative = 1e-14);
        for (found, expected) in chain.temperatures(1, 360.0).iter().zip([390.0, 360.0, 350.0]) {
            assert_relative_eq!(*found, expected, max_relative = 1e-14);
        }
        for (found, expected) in chain.shares(1, 360.0).iter().zip([0.25, 1.0, 5.0 / 6.0]) {
            assert_relative_eq!(*found, expected, max_relative = 1e-14);
        }
    }

    #[test]
    fn a_wall_held_hot_inside_that_radiates_outside() {
        // NAFEMS T2: 0.1 m, 55.6 W/(m K), 1000 K inside, emissivity 0.98 to 300 K: 927.00 K outside.
        let held = End { outside: Outside::Held(1000.0), area: 1.0 };
        let outside =
            Outside::Exchange { film: 0.0, temperature: 0.0, emissivity: 0.98, radiation_to: 300.0 };
        let chain = Chain { to_next: vec![0.1 / 55.6], ends: [held, End { outside, area: 1.0 }] };
        assert_relative_eq!(chain.settles(0).unwrap(), 1000.0);
        assert_relative_eq!(chain.settles(1).unwrap(), 927.004, epsilon = 0.001);
        assert_relative_eq!(chain.temperatures(0, 1000.0)[1], 927.004, epsilon = 0.001);
    }

    #[test]
    fn a_heated_face_raises_what_it_settles_at() {
        let heated = End { outside: Outside::Given(50.0), area: 2.0 };
        let chain = Chain { to_next: vec![0.5], ends: [heated, exchange(5.0, 300.0, 0.0)] };
        // 100 W over 0.1 K/W outside and 0.5 K/W within.
        assert_relative_eq!(chain.settles(1).unwrap(), 310.0, max_relative = 1e-14);
        assert_relative_eq!(chain.settles(0).unwrap(), 360.0, max_relative = 1e-14);
        assert_relative_eq!(chain.shares(1, 310.0)[0], 1.0);
    }

    #[test]
    fn where_nothing_draws_nothing_settles() {
        assert_eq!(Chain { to_next: vec![], ends: [CLOSED, CLOSED] }.settles(0), None);
        let freezing = End { outside: Outside::Given(-1e6), area: 1.0 };
        assert_eq!(Chain { to_next: vec![], ends: [freezing, exchange(1.0, 300.0, 0.0)] }.settles(0), None);
    }

    #[test]
    fn film_and_radiation_together_are_one_film() {
        let outside =
            Outside::Exchange { film: 8.0, temperature: 290.0, emissivity: 0.9, radiation_to: 280.0 };
        let (film, temperature) = outside.as_film(350.0).unwrap();
        assert_relative_eq!(film * (350.0 - temperature), outside.out(350.0).0, max_relative = 1e-12);
    }
}
