//! Linear systems over nodes and links: the only place that knows how nodes are arranged.

/// A matrix with one entry per node and two per link. Row `a` holds `diagonal[a]` and, for a link from `a` to
/// `b`, `-from_b`; row `b` holds `-from_a`.
#[derive(Clone, Debug, Default)]
pub struct Matrix {
    /// One per node.
    pub diagonal: Vec<f64>,
    /// One per link: what a change at `a` does to the heat that arrives at `b`.
    pub from_a: Vec<f64>,
    /// One per link: what a change at `b` does to the heat that arrives at `a`.
    pub from_b: Vec<f64>,
}

/// A way to solve such systems: factor once, solve many times.
pub trait Linear {
    /// Takes the matrix in. It must be dominated by its diagonal, as a heat balance over a time step is.
    fn factor(&mut self, matrix: &Matrix);
    /// Replaces the right side by the solution.
    fn solve(&self, right_side: &mut [f64]);
}

/// Nodes in a row, link `i` between node `i` and `i + 1` (Thomas 1949, without pivoting, which diagonal
/// dominance makes stable).
#[derive(Clone, Debug, Default)]
pub struct Tridiagonal {
    /// Reciprocals of the pivots.
    pivot: Vec<f64>,
    /// Multipliers of the elimination, one per link.
    below: Vec<f64>,
    /// Entries above the pivots divided by them, one per link.
    above: Vec<f64>,
}

impl Linear for Tridiagonal {
    fn factor(&mut self, matrix: &Matrix) {
        let nodes = matrix.diagonal.len();
        self.pivot.resize(nodes, 0.0);
        self.below.resize(nodes - 1, 0.0);
        self.above.resize(nodes - 1, 0.0);
        let mut pivot = 1.0 / matrix.diagonal[0];
        self.pivot[0] = pivot;
        let links = matrix.from_a.iter().zip(&matrix.from_b);
        let out = self.below.iter_mut().zip(&mut self.above).zip(&mut self.pivot[1..]);
        for (((from_a, from_b), diagonal), ((below, above), next)) in
            links.zip(&matrix.diagonal[1..]).zip(out)
        {
            *below = from_a * pivot;
            *above = from_b * pivot;
            pivot = 1.0 / (diagonal - *below * from_b);
            *next = pivot;
        }
    }

    fn solve(&self, right_side: &mut [f64]) {
        let mut carried = right_side[0];
        for (x, below) in right_side[1..].iter_mut().zip(&self.below) {
            carried = *x + below * carried;
            *x = carried;
        }
        let last = right_side.len() - 1;
        carried *= self.pivot[last];
        right_side[last] = carried;
        let inner = right_side[..last].iter_mut().zip(&self.pivot).zip(&self.above);
        for ((x, pivot), above) in inner.rev() {
            carried = *x * pivot + above * carried;
            *x = carried;
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_solution_put_back_gives_the_right_side() {
        let matrix = Matrix {
            diagonal: vec![3.0, 4.0, 5.0, 2.5],
            from_a: vec![1.0, 0.5, 2.0],
            from_b: vec![0.7, 1.5, 1.0],
        };
        let right = [1.0, -2.0, 3.0, 0.25];
        let mut x = right;
        let mut solver = Tridiagonal::default();
        solver.factor(&matrix);
        solver.solve(&mut x);
        for i in 0..4 {
            let mut sum = matrix.diagonal[i] * x[i];
            if i > 0 {
                sum -= matrix.from_a[i - 1] * x[i - 1];
            }
            if i < 3 {
                sum -= matrix.from_b[i] * x[i + 1];
            }
            assert!((sum - right[i]).abs() < 1e-14, "row {i}: {sum}");
        }
    }
}
