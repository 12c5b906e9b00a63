//! Published and closed-form check values, from `tests/reference/indices.toml`; each entry names its source there.

use approx::assert_relative_eq;
use deshielo::generator::{Matrix, ResidualCorrelations, WetDayChain};
use toml::Table;

fn check(id: &str) -> Table {
    let table: Table = include_str!("../reference/indices.toml").parse().unwrap();
    let found = table["check"].as_array().unwrap().iter().find(|check| check["id"].as_str() == Some(id));
    found.unwrap_or_else(|| panic!("no check {id}")).as_table().unwrap().clone()
}

fn numbers(value: &toml::Value) -> Vec<f64> {
    value.as_array().unwrap().iter().map(|number| number.as_float().unwrap()).collect()
}

fn matrix(value: &toml::Value) -> Matrix {
    let flat = numbers(value);
    core::array::from_fn(|row| core::array::from_fn(|column| flat[3 * row + column]))
}

/// Holds a matrix to the computed values and, more loosely, to the printed ones (recalled, M0 and M1 being rounded).
fn hold(found: &Matrix, check: &Table) {
    let tolerance = check["rel_tol"].as_float().unwrap();
    let printed_to = check["hold_printed_to"].as_float().unwrap();
    let (expected, printed) = (matrix(&check["expected"]), matrix(&check["printed"]));
    for row in 0..3 {
        for column in 0..3 {
            assert_relative_eq!(found[row][column], expected[row][column], max_relative = tolerance, epsilon = 1e-12);
            assert!((found[row][column] - printed[row][column]).abs() <= printed_to, "{row} {column}");
        }
    }
}

#[test]
fn residual_matrices_of_richardson_and_wright() {
    let carry = check("wgen_a");
    let inputs = carry["inputs"].as_table().unwrap();
    let given = ResidualCorrelations { same_day: matrix(&inputs["m0"]), day_before: matrix(&inputs["m1"]) };
    assert_eq!(given, ResidualCorrelations::RICHARDSON_WRIGHT_1984);
    let memory = given.memory().unwrap();
    hold(&memory.carry, &carry);
    hold(&memory.shock, &check("wgen_b"));
}

#[test]
fn printed_matrices_keep_the_residuals_spread() {
    let check = check("wgen_stationary");
    let inputs = check["inputs"].as_table().unwrap();
    let (a, b) = (matrix(&inputs["a"]), matrix(&inputs["b"]));
    // The stationary covariance by repetition: S = A S Aᵀ + B Bᵀ.
    let mut covariance = [[0.0; 3]; 3];
    for _ in 0..500 {
        covariance = core::array::from_fn(|row| {
            core::array::from_fn(|column| {
                let mut sum = 0.0;
                for left in 0..3 {
                    sum += b[row][left] * b[column][left];
                    for right in 0..3 {
                        sum += a[row][left] * covariance[left][right] * a[column][right];
                    }
                }
                sum
            })
        });
    }
    for (at, expected) in numbers(&check["expected"]).iter().enumerate() {
        assert_relative_eq!(covariance[at][at], *expected, max_relative = check["rel_tol"].as_float().unwrap());
    }
}

#[test]
fn wet_day_chains_in_closed_form() {
    for id in ["markov_0_25_0_6", "markov_0_1_0_45"] {
        let check = check(id);
        let chain = WetDayChain {
            dry_to_wet: check["inputs"]["p01"].as_float().unwrap(),
            wet_to_wet: check["inputs"]["p11"].as_float().unwrap(),
        };
        let found = [chain.wet_share(), chain.mean_wet_spell_days(), chain.mean_dry_spell_days()];
        for (found, expected) in found.iter().zip(numbers(&check["expected"])) {
            assert_relative_eq!(*found, expected, max_relative = check["rel_tol"].as_float().unwrap());
        }
        let back = WetDayChain::from_share(chain.wet_share(), chain.persistence());
        assert_relative_eq!(back.dry_to_wet, chain.dry_to_wet, max_relative = 1e-12);
        assert_relative_eq!(back.wet_to_wet, chain.wet_to_wet, max_relative = 1e-12);
    }
}
