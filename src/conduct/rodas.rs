//! One time step: RODAS of order 4(3), six stages, stiffly accurate and L-stable.
//!
//! Source: Hairer and Wanner, Solving Ordinary Differential Equations II, 2nd ed. 1996, section IV.7, the
//! method with coefficient set 1. Solved for `w` in `C w / (gamma dt) + G w = flows(stage) + C sum(c w) / dt +
//! d dt flows_t`, with the capacities `C` and `G`, minus the derivative of the flows, at the start of the step:
//! temperatures move by `w`, stored heat by `C w`, so heat is conserved to rounding at any step size.

use super::balance::Balance;
use super::faces::FaceNow;
use super::linear::{Linear, Matrix};
use crate::item::Face;

const GAMMA: f64 = 0.25;
/// When each stage looks at the surroundings, as a part of the step.
const ALPHA: [f64; 6] = [0.0, 0.386, 0.21, 0.63, 1.0, 1.0];
/// Weight of the change of the surroundings in each stage.
const D: [f64; 6] = [0.25, -0.1043, 0.1035, -0.036_200_000_000_000_23, 0.0, 0.0];
const A2: [f64; 1] = [1.544];
const A3: [f64; 2] = [0.946_678_528_081_582_6, 0.255_701_169_898_328_4];
const A4: [f64; 3] = [3.314_825_187_068_521, 2.896_124_015_972_201, 0.998_641_913_997_781_7];
const A5: [f64; 4] =
    [1.221_224_509_226_641, 6.019_134_481_288_629, 12.537_083_329_320_87, -0.687_886_036_105_895];
const A6: [f64; 5] = [A5[0], A5[1], A5[2], A5[3], 1.0];
const C2: [f64; 1] = [-5.6688];
const C3: [f64; 2] = [-2.430_093_356_833_875, -0.206_359_915_709_191_5];
const C4: [f64; 3] = [-0.107_352_905_815_137_5, -9.594_562_251_023_355, -20.470_286_148_096_16];
const C5: [f64; 4] =
    [7.496_443_313_967_647, -10.246_804_314_643_52, -33.999_903_528_199_05, 11.708_908_932_061_6];
const C6: [f64; 5] = [
    8.083_246_795_921_522,
    -7.981_132_988_064_893,
    -31.521_594_328_743_71,
    16.319_305_431_231_36,
    -6.058_818_238_834_054,
];
/// Dense output of order 3, same source.
const DENSE_2: [f64; 5] = [
    10.126_235_083_445_86,
    -7.487_995_877_610_167,
    -34.800_918_615_557_47,
    -7.992_771_707_568_823,
    1.025_137_723_295_662,
];
const DENSE_3: [f64; 5] = [
    -0.676_280_339_280_125_3,
    6.087_714_651_680_015,
    16.430_843_208_924_78,
    24.767_225_114_183_86,
    -6.594_389_125_716_872,
];

/// A moment of the march.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Moment {
    /// s
    pub time: f64,
    /// K, one per node.
    pub temperatures: Vec<f64>,
    /// Heat stored in each node whose capacity varies, J, in the order of the balance.
    pub varying_heat: Vec<f64>,
    /// Heat that came in through the inner and the outer face since the start, J.
    pub heat_in: [f64; 2],
}

/// What a step would lead to.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Attempt {
    /// Estimated error of the step, K, the largest of all nodes.
    pub error: f64,
    /// s
    pub step: f64,
}

/// The method with its working memory; one per march.
#[derive(Clone, Debug, Default)]
pub struct Rodas<L> {
    linear: L,
    matrix: Matrix,
    /// Minus the derivative at the start of the step, before the capacities are added, W/K.
    slope: Matrix,
    capacities: Vec<f64>,
    flows_first: Vec<f64>,
    /// Change of the flows per second at temperatures that stay, W/s.
    flows_per_second: Vec<f64>,
    seen_first: [Option<FaceNow>; 2],
    faces: [FaceLine; 2],
    /// Increments of the six stages, K.
    w: [Vec<f64>; 6],
    stage: Vec<f64>,
    flows: Vec<f64>,
    /// Where the last attempt led.
    next: Moment,
}

/// The running account of one face within a step.
#[derive(Clone, Debug, Default)]
struct FaceLine {
    held: bool,
    node: usize,
    area: f64,
    /// How much less heat comes in for each K of these nodes, W/K: the neighbours of a held face, else the
    /// node of the face itself.
    watched: Vec<(usize, f64)>,
    /// Change of the heat in per second at temperatures that stay, W/s.
    per_second: f64,
    /// Heat in at the start of the step, W.
    heat_first: f64,
    /// Increments of the six stages, J.
    u: [f64; 6],
}

impl<L: Linear + Default> Rodas<L> {
    /// Looks at the flows and their derivative at a moment, once for all attempts from there.
    pub fn prepare(&mut self, balance: &Balance<'_>, faces: [&Face; 2], at: &Moment) {
        let nodes = balance.nodes();
        for w in &mut self.w {
            w.resize(nodes, 0.0);
        }
        for vector in [&mut self.stage, &mut self.flows, &mut self.flows_first, &mut self.flows_per_second] {
            vector.resize(nodes, 0.0);
        }
        let seen = faces.map(|face| FaceNow::at(face, at.time));
        self.seen_first = seen.map(Some);
        balance.capacities(&at.temperatures, &mut self.capacities);
        balance.flows(&at.temperatures, &seen, &mut self.flows_first);
        balance.derivative(&at.temperatures, &seen, &mut self.slope);
        self.flows_per_second.fill(0.0);
        for side in 0..2 {
            self.prepare_face(balance, side, seen[side], at);
        }
        // Only now: the account of a held face needs the rows as they were.
        for side in 0..2 {
            if self.faces[side].held {
                balance.fix(&mut self.slope, self.faces[side].node, balance.face_links[side].iter().copied());
            }
        }
    }

    fn prepare_face(&mut self, balance: &Balance<'_>, side: usize, seen: FaceNow, at: &Moment) {
        let line = &mut self.faces[side];
        line.watched.clear();
        line.per_second = 0.0;
        line.held = false;
        line.heat_first = 0.0;
        let Some(face) = balance.faces[side] else { return };
        (line.node, line.area) = (face.node, face.area);
        if let FaceNow::Held { slope, .. } = seen {
            line.held = true;
            for &link in &balance.face_links[side] {
                let other = balance.other_end(link, face.node);
                let (arriving, leaving) = balance.coupling(&self.slope, link, face.node);
                line.watched.push((other, arriving));
                line.per_second += leaving * slope;
                self.flows_per_second[other] += leaving * slope;
            }
            line.heat_first = -self.flows_first[face.node];
        } else {
            let heat_in = seen.heat_in(at.temperatures[face.node], face.area);
            line.watched.push((face.node, heat_in.less_per_kelvin));
            line.per_second = heat_in.per_second;
            line.heat_first = heat_in.heat;
            self.flows_per_second[face.node] += heat_in.per_second;
        }
    }

    /// Tries a step of `dt` from the prepared moment; `next` holds where it leads.
    pub fn attempt(&mut self, balance: &Balance<'_>, faces: [&Face; 2], at: &Moment, dt: f64) -> Attempt {
        self.matrix.from_a.clone_from(&self.slope.from_a);
        self.matrix.from_b.clone_from(&self.slope.from_b);
        self.matrix.diagonal.clear();
        let over = 1.0 / (GAMMA * dt);
        self.matrix
            .diagonal
            .extend(self.slope.diagonal.iter().zip(&self.capacities).map(|(g, c)| g + c * over));
        for line in &self.faces {
            if line.held {
                self.matrix.diagonal[line.node] = 1.0;
            }
        }
        self.linear.factor(&self.matrix);
        self.first_stage(dt);
        self.stage(balance, faces, at, dt, 1, A2, C2);
        self.stage(balance, faces, at, dt, 2, A3, C3);
        self.stage(balance, faces, at, dt, 3, A4, C4);
        self.stage(balance, faces, at, dt, 4, A5, C5);
        self.stage(balance, faces, at, dt, 5, A6, C6);
        self.finish(balance, faces, at, dt)
    }

    fn first_stage(&mut self, dt: f64) {
        let per_second = D[0] * dt;
        let right = self.flows_first.iter().zip(&self.flows_per_second).map(|(f, t)| f + per_second * t);
        for (w, right) in self.w[0].iter_mut().zip(right) {
            *w = right;
        }
        for line in &self.faces {
            if line.held {
                self.w[0][line.node] = 0.0;
            }
        }
        self.linear.solve(&mut self.w[0]);
        for line in &mut self.faces {
            line.account(0, line.heat_first, &self.w, &[], dt);
        }
    }

    #[allow(clippy::too_many_arguments)]
    fn stage<const N: usize>(
        &mut self,
        balance: &Balance<'_>,
        faces: [&Face; 2],
        at: &Moment,
        dt: f64,
        number: usize,
        a: [f64; N],
        c: [f64; N],
    ) {
        let seen = faces.map(|face| FaceNow::at(face, at.time + ALPHA[number] * dt));
        combine(&mut self.stage, &at.temperatures, a, &self.w);
        self.complete(balance, at, &seen, a);
        balance.flows(&self.stage, &seen, &mut self.flows);
        let (done, rest) = self.w.split_at_mut(number);
        let right = &mut rest[0];
        combine_scaled(right, &self.flows, &self.capacities, c.map(|c| c / dt), done);
        if D[number] != 0.0 {
            for (right, per_second) in right.iter_mut().zip(&self.flows_per_second) {
                *right += D[number] * dt * per_second;
            }
        }
        for line in &self.faces {
            if line.held {
                right[line.node] = 0.0;
            }
        }
        self.linear.solve(right);
        for (line, seen) in self.faces.iter_mut().zip(seen) {
            let heat = line.heat_in(&self.flows, seen, &self.stage);
            line.account(number, heat, &self.w, &c, dt);
        }
    }

    /// Where `combine` does not do: held faces, and nodes whose temperature follows from their heat.
    fn complete<const N: usize>(
        &mut self,
        balance: &Balance<'_>,
        at: &Moment,
        seen: &[FaceNow; 2],
        a: [f64; N],
    ) {
        for (node, heat) in balance.varying.iter().zip(&at.varying_heat) {
            let i = node.node;
            let moved: f64 = (0..N).map(|j| a[j] * self.w[j][i]).sum();
            self.stage[i] = node.temperature(heat + self.capacities[i] * moved, self.stage[i]);
        }
        for (face, seen) in balance.faces.iter().zip(seen) {
            if let (Some(face), FaceNow::Held { temperature, .. }) = (face, seen) {
                self.stage[face.node] = *temperature;
            }
        }
    }

    fn finish(&mut self, balance: &Balance<'_>, faces: [&Face; 2], at: &Moment, dt: f64) -> Attempt {
        let next = &mut self.next;
        next.time = at.time + dt;
        next.temperatures.clear();
        next.temperatures.extend(self.stage.iter().zip(&self.w[5]).map(|(stage, w)| stage + w));
        next.varying_heat.clear();
        for (node, heat) in balance.varying.iter().zip(&at.varying_heat) {
            let i = node.node;
            let moved: f64 = (0..5).map(|j| A6[j] * self.w[j][i]).sum::<f64>() + self.w[5][i];
            let heat = heat + self.capacities[i] * moved;
            next.varying_heat.push(heat);
            next.temperatures[i] = node.temperature(heat, next.temperatures[i]);
        }
        next.heat_in = at.heat_in;
        for side in 0..2 {
            let line = &self.faces[side];
            next.heat_in[side] += (0..5).map(|j| A6[j] * line.u[j]).sum::<f64>() + line.u[5];
            if let FaceNow::Held { temperature, .. } = FaceNow::at(faces[side], next.time)
                && line.held
            {
                hold(balance, next, side, line.node, temperature, at);
            }
        }
        let error = self.w[5].iter().fold(0.0, |most: f64, w| if w.abs() <= most { most } else { w.abs() });
        Attempt { error, step: dt }
    }

    /// Where the last attempt led.
    pub fn next(&self) -> &Moment {
        &self.next
    }

    /// Takes over where the last attempt led.
    pub fn take(&mut self, at: &mut Moment) {
        std::mem::swap(at, &mut self.next);
    }

    /// Rate of change of every node at the prepared moment, K/s.
    pub fn rates(&self, out: &mut Vec<f64>) {
        out.clear();
        out.extend(self.flows_first.iter().zip(&self.capacities).map(|(flow, capacity)| flow / capacity));
        for (line, seen) in self.faces.iter().zip(self.seen_first) {
            if let Some(FaceNow::Held { slope, .. }) = seen
                && line.held
            {
                out[line.node] = slope;
            }
        }
    }

    /// How far everything still is from its steady state if the surroundings stay as they are: the largest
    /// change that an endless step would make, K.
    pub fn distance_to_steady(&mut self, longest: f64) -> f64 {
        self.matrix.clone_from(&self.slope);
        for (g, c) in self.matrix.diagonal.iter_mut().zip(&self.capacities) {
            *g += c / longest;
        }
        self.linear.factor(&self.matrix);
        self.stage.clone_from(&self.flows_first);
        for line in &self.faces {
            if line.held {
                self.stage[line.node] = 0.0;
            }
        }
        self.linear.solve(&mut self.stage);
        self.stage.iter().fold(0.0, |most: f64, change| most.max(change.abs()))
    }

    /// The two vectors of the dense output of the last attempt, K: with `s` from 0 to 1 within the step,
    /// `T(s) = (1 - s) T0 + s (T1 + (1 - s) (first + s second))`.
    pub fn dense(&self, first: &mut Vec<f64>, second: &mut Vec<f64>) {
        for (out, weights) in [(first, DENSE_2), (second, DENSE_3)] {
            out.clear();
            out.resize(self.w[0].len(), 0.0);
            for (weight, w) in weights.iter().zip(&self.w) {
                for (out, w) in out.iter_mut().zip(w) {
                    *out += weight * w;
                }
            }
        }
    }
}

impl FaceLine {
    /// The increment of the heat in for one stage: the same equation as that of the temperatures, so that what
    /// is stored and what came in agree to rounding.
    fn account(&mut self, number: usize, heat: f64, w: &[Vec<f64>; 6], c: &[f64], dt: f64) {
        let less: f64 = self.watched.iter().map(|&(node, less)| less * w[number][node]).sum();
        let earlier: f64 = c.iter().zip(&self.u).map(|(c, u)| c * u).sum();
        self.u[number] = GAMMA * dt * (heat - less + earlier / dt + D[number] * dt * self.per_second);
    }

    /// Heat into the item through this face at a stage, W.
    fn heat_in(&self, flows: &[f64], seen: FaceNow, temperatures: &[f64]) -> f64 {
        if self.held {
            -flows[self.node]
        } else if self.watched.is_empty() {
            0.0
        } else {
            seen.heat_in(temperatures[self.node], self.area).heat
        }
    }
}

/// Moves a held face to its temperature; the heat for that comes from its surroundings.
pub(super) fn hold(
    balance: &Balance<'_>,
    moment: &mut Moment,
    side: usize,
    node: usize,
    temperature: f64,
    before: &Moment,
) {
    moment.temperatures[node] = temperature;
    if let Some(i) = balance.varying.iter().position(|varying| varying.node == node) {
        let heat = balance.varying[i].heat(temperature);
        moment.heat_in[side] += heat - before.varying_heat[i];
        moment.varying_heat[i] = heat;
    } else {
        moment.heat_in[side] += balance.constant[node] * (temperature - before.temperatures[node]);
    }
}

/// `out = base + sum a w`
#[inline]
fn combine<const N: usize>(out: &mut [f64], base: &[f64], a: [f64; N], w: &[Vec<f64>]) {
    let base = &base[..out.len()];
    let w: [&[f64]; N] = std::array::from_fn(|j| &w[j][..out.len()]);
    for i in 0..out.len() {
        let mut sum = base[i];
        for j in 0..N {
            sum += a[j] * w[j][i];
        }
        out[i] = sum;
    }
}

/// `out = base + weight sum a w`
#[inline]
fn combine_scaled<const N: usize>(
    out: &mut [f64],
    base: &[f64],
    weight: &[f64],
    a: [f64; N],
    w: &[Vec<f64>],
) {
    let (base, weight) = (&base[..out.len()], &weight[..out.len()]);
    let w: [&[f64]; N] = std::array::from_fn(|j| &w[j][..out.len()]);
    for i in 0..out.len() {
        let mut sum = 0.0;
        for j in 0..N {
            sum += a[j] * w[j][i];
        }
        out[i] = base[i] + weight[i] * sum;
    }
}
