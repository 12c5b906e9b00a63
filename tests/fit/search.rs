//! The search against the paper's formulas, and on standard functions against an independent implementation.

use crate::support::{assert_check, checks, number};
use deshielo::fit::search::{STEP_SHARE, Search, first_guesses, inclusion_probability, reflect};

#[test]
fn inclusion_probability_and_reflection() {
    let checks = checks("indices");
    let mut seen = 0;
    for (id, check) in &checks {
        let inputs = |name: &str| number(&check["inputs"].as_table().unwrap()[name]);
        if id.starts_with("dds_p_") {
            let (i, m) = (inputs("i") as usize, inputs("m") as usize);
            assert_check(check, inclusion_probability(i, m));
            seen += 1;
        } else if id.starts_with("dds_reflect_") {
            assert_check(check, reflect(inputs("x_new")));
            seen += 1;
        }
    }
    assert_eq!(seen, 10);
    assert_check(&checks["dds_r"], STEP_SHARE);
    assert_eq!(inclusion_probability(1, 1), 1.0);
    assert_eq!([first_guesses(3), first_guesses(100), first_guesses(10_000)], [3, 5, 50]);
}

#[test]
fn as_many_dimensions_change_as_the_formula_says() {
    let check = &checks("indices")["dds_expected_dims"];
    let inputs = check["inputs"].as_table().unwrap();
    let of = |name: &str| number(&inputs[name]) as usize;
    let (n, m, i) = (of("n"), of("m"), of("i"));
    // m iterations after the first guesses: the number of points at which these two add up.
    let points = (m..2 * m).find(|points| points - first_guesses(*points) == m).unwrap();
    let seeds = 20_000;
    let mut changed = 0;
    for seed in 0..seeds {
        let mut search = Search::new(n, points, seed);
        for _ in 0..first_guesses(points) + i - 1 {
            search.learn(0.0);
        }
        search.propose();
        assert!(search.changed() >= 1);
        changed += search.changed();
    }
    let mean = changed as f64 / seeds as f64;
    // Binomial with n P of about 3.3: standard deviation about 1.47 a draw.
    let limit = 4.0 * 1.5 / (seeds as f64).sqrt();
    assert!((mean - number(&check["expected"])).abs() < limit, "mean {mean}");
}

/// Mean over seeds of the smallest value found in 1000 evaluations of a function of ten numbers.
fn mean_of_smallest(function: impl Fn(&[f64]) -> f64, half_width: f64) -> f64 {
    let seeds = 60;
    let total: f64 = (0..seeds)
        .map(|seed| {
            let mut search = Search::new(10, 1000, seed);
            while !search.is_over() {
                let x: Vec<f64> = search.propose().iter().map(|at| half_width * (2.0 * at - 1.0)).collect();
                assert!(x.iter().all(|x| x.abs() <= half_width));
                search.learn(-function(&x));
            }
            -search.best_score()
        })
        .sum();
    total / f64::from(seeds as u32)
}

#[test]
fn standard_functions() {
    let checks = checks("indices");
    let sphere = |x: &[f64]| x.iter().map(|x| x * x).sum::<f64>();
    let griewank = |x: &[f64]| {
        let product: f64 = x.iter().enumerate().map(|(at, x)| libm::cos(x / ((at + 1) as f64).sqrt())).product();
        1.0 + sphere(x) / 4000.0 - product
    };
    assert_check(&checks["dds_sphere10"], mean_of_smallest(sphere, 5.0));
    assert_check(&checks["dds_griewank10"], mean_of_smallest(griewank, 600.0));
}

#[test]
fn a_search_keeps_its_best_and_survives_scores_that_are_no_numbers() {
    let mut search = Search::new(3, 200, 5);
    let mut best = f64::NEG_INFINITY;
    let mut tried = 0;
    while !search.is_over() {
        let point = search.propose().to_vec();
        let score = if tried % 3 == 0 { f64::NAN } else { -point.iter().map(|at| (at - 0.7).abs()).sum::<f64>() };
        search.learn(score);
        best = best.max(score);
        assert_eq!(search.best_score(), best);
        tried += 1;
    }
    assert_eq!(tried, 200);
    assert!(search.best_score() > -0.2);
    let again: Vec<f64> = {
        let mut search = Search::new(3, 200, 5);
        search.propose().to_vec()
    };
    let other = Search::new(3, 200, 6).propose().to_vec();
    assert_eq!(again, Search::new(3, 200, 5).propose());
    assert_ne!(again, other);
    let mut nothing = Search::new(0, 10, 1);
    assert!(nothing.propose().is_empty());
}
