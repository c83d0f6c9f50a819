//! A property over temperature with its exact integral.
//!
//! Conduction needs the integral of the conductivity (the heat flux between two temperatures is exact then,
//! after Kirchhoff 1894), storage the integral of the heat capacity (enthalpy). Both come from one type:
//! piecewise polynomials, held at their end values outside their range.

/// A property over temperature (K).
#[derive(Clone, Debug, PartialEq)]
pub enum Law {
    /// The same at every temperature.
    Constant(f64),
    /// Polynomials between knots; constant outside.
    Pieces(Pieces),
}

/// Polynomials between ascending knots.
#[derive(Clone, Debug, PartialEq)]
pub struct Pieces {
    /// Temperatures, K; one more than pieces.
    knots: Vec<f64>,
    /// Per piece, coefficients from the constant up in `T - left knot`.
    coefficients: Vec<Vec<f64>>,
    /// Integral from the first knot to each knot.
    integrals: Vec<f64>,
    /// Value at the last knot, held above it.
    last: f64,
}

impl Law {
    /// Straight lines between points (K, value); ascending, at least two.
    pub fn table(points: &[(f64, f64)]) -> Self {
        let pieces = points.windows(2).map(|pair| {
            let slope = (pair[1].1 - pair[0].1) / (pair[1].0 - pair[0].0);
            vec![pair[0].1, slope]
        });
        let knots = points.iter().map(|point| point.0).collect();
        Self::Pieces(Pieces::new(knots, pieces.collect()))
    }

    /// One polynomial in `T - from` between `from` and `to` (K), coefficients from the constant up.
    pub fn polynomial(from: f64, to: f64, coefficients: Vec<f64>) -> Self {
        Self::Pieces(Pieces::new(vec![from, to], vec![coefficients]))
    }

    /// One polynomial in `T - origin` between `from` and `to` (K), coefficients from the constant up.
    pub fn polynomial_about(origin: f64, from: f64, to: f64, coefficients: &[f64]) -> Self {
        Self::polynomial(from, to, shifted(coefficients, from - origin))
    }

    /// Polynomials in `T - left knot` between ascending knots (K).
    pub fn pieces(knots: Vec<f64>, coefficients: Vec<Vec<f64>>) -> Self {
        Self::Pieces(Pieces::new(knots, coefficients))
    }

    /// The value at a temperature.
    pub fn value(&self, temperature: f64) -> f64 {
        match self {
            Self::Constant(value) => *value,
            Self::Pieces(pieces) => pieces.value(temperature),
        }
    }

    /// The integral over temperature from a fixed reference (0 K for a constant, else the first knot).
    pub fn integral(&self, temperature: f64) -> f64 {
        match self {
            Self::Constant(value) => value * temperature,
            Self::Pieces(pieces) => pieces.integral(temperature),
        }
    }

    /// Product of two laws; outside its own range each is held at its own end values.
    #[must_use]
    pub fn times(&self, other: &Self) -> Self {
        match (self, other) {
            (Self::Constant(a), Self::Constant(b)) => Self::Constant(a * b),
            (Self::Constant(a), Self::Pieces(pieces)) | (Self::Pieces(pieces), Self::Constant(a)) => {
                Self::Pieces(pieces.scaled(*a))
            }
            (Self::Pieces(a), Self::Pieces(b)) => Self::Pieces(a.times(b)),
        }
    }

    /// The same value at every temperature?
    pub fn constant(&self) -> Option<f64> {
        match self {
            Self::Constant(value) => Some(*value),
            Self::Pieces(_) => None,
        }
    }

    /// Lowest and highest value anywhere.
    pub fn extent(&self) -> (f64, f64) {
        match self {
            Self::Constant(value) => (*value, *value),
            Self::Pieces(pieces) => pieces.extent(),
        }
    }
}

impl Pieces {
    fn new(knots: Vec<f64>, coefficients: Vec<Vec<f64>>) -> Self {
        assert!(
            knots.len() == coefficients.len() + 1 && knots.windows(2).all(|pair| pair[0] < pair[1]),
            "knots ascend and enclose the pieces"
        );
        let mut integrals = vec![0.0];
        for (pair, piece) in knots.windows(2).zip(&coefficients) {
            integrals.push(integrals[integrals.len() - 1] + antiderivative(piece, pair[1] - pair[0]));
        }
        let width = knots[knots.len() - 1] - knots[knots.len() - 2];
        let last = polynomial(&coefficients[coefficients.len() - 1], width);
        Self { knots, coefficients, integrals, last }
    }

    /// Number of the piece that holds a temperature between the first and the last knot.
    fn piece(&self, temperature: f64) -> usize {
        self.knots.partition_point(|&knot| knot <= temperature).clamp(1, self.coefficients.len()) - 1
    }

    fn value(&self, temperature: f64) -> f64 {
        if temperature <= self.knots[0] {
            return self.coefficients[0][0];
        }
        if temperature >= self.knots[self.knots.len() - 1] {
            return self.last;
        }
        let i = self.piece(temperature);
        polynomial(&self.coefficients[i], temperature - self.knots[i])
    }

    fn integral(&self, temperature: f64) -> f64 {
        let (first, top) = (self.knots[0], self.knots[self.knots.len() - 1]);
        if temperature <= first {
            return self.coefficients[0][0] * (temperature - first);
        }
        if temperature >= top {
            return self.integrals[self.integrals.len() - 1] + self.last * (temperature - top);
        }
        let i = self.piece(temperature);
        self.integrals[i] + antiderivative(&self.coefficients[i], temperature - self.knots[i])
    }

    fn scaled(&self, factor: f64) -> Self {
        let scale = |piece: &Vec<f64>| piece.iter().map(|c| c * factor).collect();
        Self::new(self.knots.clone(), self.coefficients.iter().map(scale).collect())
    }

    fn times(&self, other: &Self) -> Self {
        let mut knots: Vec<f64> = self.knots.iter().chain(&other.knots).copied().collect();
        knots.sort_by(f64::total_cmp);
        knots.dedup();
        let product = |pair: &[f64]| {
            let middle = 0.5 * (pair[0] + pair[1]);
            multiply(&self.around(middle, pair[0]), &other.around(middle, pair[0]))
        };
        let coefficients = knots.windows(2).map(product).collect();
        Self::new(knots, coefficients)
    }

    /// The polynomial that holds at `temperature`, written in `T - origin`.
    fn around(&self, temperature: f64, origin: f64) -> Vec<f64> {
        if temperature <= self.knots[0] {
            return vec![self.coefficients[0][0]];
        }
        if temperature >= self.knots[self.knots.len() - 1] {
            return vec![self.last];
        }
        let i = self.piece(temperature);
        shifted(&self.coefficients[i], origin - self.knots[i])
    }

    fn extent(&self) -> (f64, f64) {
        let (mut low, mut high) = (self.last, self.last);
        for (pair, piece) in self.knots.windows(2).zip(&self.coefficients) {
            let width = pair[1] - pair[0];
            let turns = roots(&derivative(piece), width);
            for x in [0.0, width].into_iter().chain(turns) {
                let value = polynomial(piece, x);
                (low, high) = (low.min(value), high.max(value));
            }
        }
        (low, high)
    }
}

/// Value of a polynomial, coefficients from the constant up.
fn polynomial(coefficients: &[f64], x: f64) -> f64 {
    coefficients.iter().rev().fold(0.0, |sum, c| sum * x + c)
}

/// Its derivative.
fn derivative(coefficients: &[f64]) -> Vec<f64> {
    coefficients.iter().enumerate().skip(1).map(|(i, c)| c * i as f64).collect()
}

/// Where it changes its sign between 0 and `width`: once at most between two roots of its derivative.
fn roots(coefficients: &[f64], width: f64) -> Vec<f64> {
    /// Halvings of a bracket down to the last bit.
    const HALVINGS: usize = 60;
    if coefficients.len() < 2 {
        return Vec::new();
    }
    let mut marks = vec![0.0];
    marks.extend(roots(&derivative(coefficients), width));
    marks.push(width);
    let mut found = Vec::new();
    for pair in marks.windows(2) {
        let (mut left, mut right) = (pair[0], pair[1]);
        let rises = polynomial(coefficients, left) < 0.0;
        if rises == (polynomial(coefficients, right) < 0.0) {
            continue;
        }
        for _ in 0..HALVINGS {
            let middle = 0.5 * (left + right);
            if rises == (polynomial(coefficients, middle) < 0.0) {
                left = middle;
            } else {
                right = middle;
            }
        }
        found.push(left);
    }
    found
}

/// Its integral from 0 to x.
fn antiderivative(coefficients: &[f64], x: f64) -> f64 {
    coefficients.iter().enumerate().rev().fold(0.0, |sum, (i, c)| sum * x + c / (i + 1) as f64) * x
}

/// The same polynomial in a variable that begins `by` further on (Horner's scheme, repeated).
fn shifted(coefficients: &[f64], by: f64) -> Vec<f64> {
    let mut out = coefficients.to_vec();
    for i in 0..out.len() {
        for j in (i..out.len() - 1).rev() {
            out[j] += by * out[j + 1];
        }
    }
    out
}

fn multiply(a: &[f64], b: &[f64]) -> Vec<f64> {
    let mut out = vec![0.0; a.len() + b.len() - 1];
    for (i, x) in a.iter().enumerate() {
        for (j, y) in b.iter().enumerate() {
            out[i + j] += x * y;
        }
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    #[test]
    fn a_table_is_straight_between_points_and_held_outside() {
        let law = Law::table(&[(300.0, 1.0), (400.0, 3.0), (600.0, 2.0)]);
        assert_relative_eq!(law.value(350.0), 2.0);
        assert_relative_eq!(law.value(200.0), 1.0);
        assert_relative_eq!(law.value(900.0), 2.0);
        assert_relative_eq!(law.integral(600.0) - law.integral(300.0), 200.0 + 500.0);
        assert_relative_eq!(law.integral(700.0) - law.integral(600.0), 200.0);
        assert_relative_eq!(law.integral(300.0) - law.integral(250.0), 50.0);
    }

    #[test]
    fn a_polynomial_may_be_written_about_any_origin() {
        let law = Law::polynomial_about(273.15, 293.15, 373.15, &[425.0, 0.773, -1.69e-3, 2.22e-6]);
        let x = 350.0 - 273.15;
        let expected = 425.0 + x * (0.773 + x * (-1.69e-3 + x * 2.22e-6));
        assert_relative_eq!(law.value(350.0), expected, max_relative = 1e-14);
    }

    #[test]
    fn a_product_is_the_product_everywhere_and_integrates_exactly() {
        let a = Law::table(&[(300.0, 1.0), (400.0, 3.0)]);
        let b = Law::polynomial(350.0, 500.0, vec![2.0, 0.01, 1e-4]);
        let both = a.times(&b);
        let mut sum = 0.0;
        let steps = 20_000;
        let width = 300.0 / f64::from(steps);
        for i in 0..steps {
            let at = 250.0 + width * (f64::from(i) + 0.5);
            assert_relative_eq!(both.value(at), a.value(at) * b.value(at), max_relative = 1e-12);
            sum += both.value(at) * width;
        }
        // Midpoint rule: error of the size width² times second derivative, 1e-8 relative.
        assert_relative_eq!(both.integral(550.0) - both.integral(250.0), sum, max_relative = 1e-7);
    }

    #[test]
    fn the_extent_finds_a_notch_of_any_width() {
        // (T - 0.3)² (T - 0.7)² - 1e-9: below 0 in two notches of 1.6e-4 K only.
        let squares = [0.0441, -0.42, 1.42, -2.0, 1.0];
        let law = Law::polynomial(
            0.0,
            1.0,
            std::iter::once(squares[0] - 1e-9).chain(squares[1..].to_vec()).collect(),
        );
        let (low, high) = law.extent();
        assert_relative_eq!(low, -1e-9, max_relative = 1e-6);
        assert_relative_eq!(high, 0.0441 - 1e-9, max_relative = 1e-12);
        assert_eq!(Law::table(&[(0.0, 2.0), (1.0, 5.0), (2.0, 1.0)]).extent(), (1.0, 5.0));
    }
}
