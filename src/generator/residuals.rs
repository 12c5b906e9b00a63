//! The day-to-day memory of temperature and sunshine: standardised residuals with lag-one matrices.
//!
//! Richardson (1981, Water Resources Research 17(1):182–190, after Matalas 1967): with the residuals of
//! maximum temperature, minimum temperature and radiation in x, `x(today) = A x(yesterday) + B e`, e three independent
//! normal deviates, `A = M1 M0⁻¹` and `B Bᵀ = M0 − A M1ᵀ`.

use serde::{Deserialize, Serialize};

/// A 3 × 3 matrix by rows; order everywhere: maximum temperature, minimum temperature, solar radiation.
pub type Matrix = [[f64; 3]; 3];

/// Correlations of the standardised residuals on the same day and from one day to the next.
#[derive(Debug, Clone, Copy, PartialEq, Serialize, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct ResidualCorrelations {
    /// Same day (M0): symmetric, ones on the diagonal.
    pub same_day: Matrix,
    /// Row variable today with column variable yesterday (M1).
    pub day_before: Matrix,
}

impl ResidualCorrelations {
    /// The average correlations of 31 stations printed by Richardson and Wright (1984), USDA ARS-8; from memory.
    pub const RICHARDSON_WRIGHT_1984: Self = Self {
        same_day: [[1.0, 0.633, 0.186], [0.633, 1.0, -0.193], [0.186, -0.193, 1.0]],
        day_before: [[0.621, 0.445, 0.087], [0.563, 0.674, -0.100], [0.015, -0.091, 0.251]],
    };

    /// The same temperatures, with radiation going its own way.
    pub(super) fn without_radiation_links(&self) -> Self {
        let alone = |matrix: &Matrix| -> Matrix {
            core::array::from_fn(|row| {
                core::array::from_fn(|column| if (row == 2) == (column == 2) { matrix[row][column] } else { 0.0 })
            })
        };
        Self { same_day: alone(&self.same_day), day_before: alone(&self.day_before) }
    }

    /// The matrices A and B, or `None` if no random process has these correlations.
    pub fn memory(&self) -> Option<ResidualMemory> {
        let start = cholesky(&self.same_day)?;
        let carry = multiply(&self.day_before, &inverse(&self.same_day)?);
        let kept = multiply(&carry, &transposed(&self.day_before));
        let shock = cholesky(&subtract(&self.same_day, &kept))?;
        Some(ResidualMemory { carry, shock, start })
    }
}

/// The residual process ready to run.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ResidualMemory {
    /// What yesterday's residuals leave for today (A).
    pub carry: Matrix,
    /// What chance adds (B, lower triangle).
    pub shock: Matrix,
    /// Lower triangle that makes the first day's residuals.
    pub start: Matrix,
}

impl ResidualMemory {
    /// Residuals of the first day from three independent normal deviates.
    pub fn first(&self, deviates: &[f64; 3]) -> [f64; 3] {
        apply(&self.start, deviates)
    }

    /// Residuals of the next day from yesterday's and three independent normal deviates.
    pub fn next(&self, yesterday: &[f64; 3], deviates: &[f64; 3]) -> [f64; 3] {
        let kept = apply(&self.carry, yesterday);
        let added = apply(&self.shock, deviates);
        core::array::from_fn(|row| kept[row] + added[row])
    }

    /// Variance that a long mean of the residuals keeps, times its number of days: (I − A)⁻¹ B Bᵀ (I − A)⁻ᵀ.
    pub(super) fn long_run_covariance(&self) -> Option<Matrix> {
        let identity: Matrix = core::array::from_fn(|row| core::array::from_fn(|column| f64::from(row == column)));
        let spread = multiply(&inverse(&subtract(&identity, &self.carry))?, &self.shock);
        Some(multiply(&spread, &transposed(&spread)))
    }
}

fn multiply(left: &Matrix, right: &Matrix) -> Matrix {
    core::array::from_fn(|row| {
        core::array::from_fn(|column| {
            left[row][0] * right[0][column] + left[row][1] * right[1][column] + left[row][2] * right[2][column]
        })
    })
}

fn subtract(left: &Matrix, right: &Matrix) -> Matrix {
    core::array::from_fn(|row| core::array::from_fn(|column| left[row][column] - right[row][column]))
}

fn transposed(matrix: &Matrix) -> Matrix {
    core::array::from_fn(|row| core::array::from_fn(|column| matrix[column][row]))
}

fn apply(matrix: &Matrix, vector: &[f64; 3]) -> [f64; 3] {
    core::array::from_fn(|row| matrix[row][0] * vector[0] + matrix[row][1] * vector[1] + matrix[row][2] * vector[2])
}

/// Inverse by cofactors; `None` if there is none.
fn inverse(matrix: &Matrix) -> Option<Matrix> {
    let cofactor = |row: usize, column: usize| {
        let (r1, r2) = ((row + 1) % 3, (row + 2) % 3);
        let (c1, c2) = ((column + 1) % 3, (column + 2) % 3);
        matrix[r1][c1] * matrix[r2][c2] - matrix[r1][c2] * matrix[r2][c1]
    };
    let determinant = matrix[0][0] * cofactor(0, 0) + matrix[0][1] * cofactor(0, 1) + matrix[0][2] * cofactor(0, 2);
    (determinant.is_finite() && determinant != 0.0)
        .then(|| core::array::from_fn(|row| core::array::from_fn(|column| cofactor(column, row) / determinant)))
}

/// Lower triangle whose product with its transpose is the matrix; `None` unless the matrix is positive definite.
fn cholesky(matrix: &Matrix) -> Option<Matrix> {
    let mut lower = [[0.0; 3]; 3];
    for row in 0..3 {
        for column in 0..=row {
            let mut rest = matrix[row][column];
            for (left, right) in lower[row].iter().zip(&lower[column]).take(column) {
                rest -= left * right;
            }
            if row == column {
                if !(rest > 0.0 && rest.is_finite()) {
                    return None;
                }
                lower[row][row] = rest.sqrt();
            } else {
                lower[row][column] = rest / lower[column][column];
            }
        }
    }
    Some(lower)
}
