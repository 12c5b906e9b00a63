//! Scores against an independent library, and the shape of errors, on series that are made up.

use super::valleys;
use crate::support::Columns;
use deshielo::signs::skill;
use deshielo::water::calendar::CalendarDay;

#[test]
fn scores_equal_an_independent_librarys() {
    let modelled = Columns::read("reference_daily.csv").numbers("q_routed_mm");
    let observed: Vec<f64> =
        modelled.iter().enumerate().map(|(day, q)| q * (1.1 + 0.3 * libm::sin(0.05 * day as f64)) + 0.02).collect();
    let path = std::path::Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/reference/skill/library_values.toml");
    let values: toml::Table = std::fs::read_to_string(path).unwrap().parse().unwrap();
    let scores = values["scores"].as_table().unwrap();
    let kge = skill::kling_gupta_2009(&modelled, &observed).unwrap();
    let kge_2012 = skill::kling_gupta_2012(&modelled, &observed).unwrap();
    let got = [
        ("nse", skill::nash_sutcliffe(&modelled, &observed).unwrap()),
        ("nse_of_roots", skill::nash_sutcliffe_of_roots(&modelled, &observed).unwrap()),
        ("kge2009", kge.efficiency),
        ("kge2009_r", kge.correlation),
        ("kge2009_alpha", kge.variability),
        ("kge2009_beta", kge.bias),
        ("kge2012", kge_2012.efficiency),
        ("kge2012_r", kge_2012.correlation),
        ("kge2012_gamma", kge_2012.variability),
        ("kge2012_beta", kge_2012.bias),
        ("rmse", skill::root_mean_square_error(&modelled, &observed).unwrap()),
        ("pbias", skill::percent_bias(&modelled, &observed).unwrap()),
    ];
    assert_eq!(got.len(), scores.len());
    for (key, got) in got {
        let want = crate::support::number(&scores[key]);
        assert!((got - want).abs() <= 1e-10 * want.abs().max(1.0), "{key}: got {got:?}, want {want:?}");
    }
}

#[test]
fn a_perfect_and_a_shifted_series() {
    let observed: Vec<f64> = (0..400).map(|day| 3.0 + libm::sin(f64::from(day) / 30.0)).collect();
    let shifted: Vec<f64> = observed.iter().map(|flow| flow + 0.3).collect();
    for perfect in [
        skill::nash_sutcliffe_of_logs(&observed, &observed),
        skill::nash_sutcliffe_of_roots(&observed, &observed),
        skill::volumetric_efficiency(&observed, &observed),
    ] {
        assert_eq!(perfect, Some(1.0));
    }
    assert_eq!(skill::rsr(&observed, &observed), Some(0.0));
    let mean = observed.iter().sum::<f64>() / 400.0;
    assert!((skill::volumetric_efficiency(&shifted, &observed).unwrap() - (1.0 - 0.3 / mean)).abs() < 1e-12);
    let ratio = skill::rsr(&shifted, &observed).unwrap();
    assert!((skill::nash_sutcliffe(&shifted, &observed).unwrap() - (1.0 - ratio * ratio)).abs() < 1e-12);
    // A factor on a series moves its logarithm by the same everywhere: low flows count as much as high ones.
    let doubled: Vec<f64> = observed.iter().map(|flow| flow * 2.0).collect();
    assert!(skill::nash_sutcliffe_of_logs(&doubled, &observed).unwrap() < 0.0);
    assert_eq!(skill::volumetric_efficiency(&[0.0; 3], &[0.0; 3]), None);
    assert_eq!(skill::nash_sutcliffe_of_roots(&[-1.0, 1.0, 2.0], &[1.0, -1.0, 2.0]), None, "one whole pair is too few");
}

fn calendar(years: i32) -> Vec<CalendarDay> {
    valleys::record(&valleys::bare_basin(1), years, 1).0
}

#[test]
fn months_and_seasons() {
    let calendar = calendar(3);
    let observed: Vec<f64> = calendar.iter().map(|day| f64::from(day.month_day.month)).collect();
    let mut modelled: Vec<f64> = observed.iter().map(|flow| flow * 0.9).collect();
    let months: Vec<_> = skill::MonthlyMeans::new(&calendar, &modelled, &observed).collect();
    assert_eq!(months.len(), 36);
    assert_eq!((months[0].water_year, months[0].month, months[0].observed), (1981, 10, 10.0));
    let (efficiency, bias) = skill::monthly_skill(&calendar, &modelled, &observed).unwrap();
    assert!(efficiency > 0.9 && (bias - 10.0).abs() < 1e-9);
    // Eight days of a month missing is one in four: the month does not count.
    modelled[..8].fill(f64::NAN);
    assert_eq!(skill::MonthlyMeans::new(&calendar, &modelled, &observed).count(), 35);

    let in_june = |day: &CalendarDay| day.month_day.month == 6;
    let mut june: Vec<f64> = observed.clone();
    for (flow, _) in june.iter_mut().zip(&calendar).filter(|(_, day)| in_june(day)) {
        *flow *= 1.25;
    }
    assert!((skill::percent_bias_on(&june, &observed, &calendar, in_june).unwrap() + 25.0).abs() < 1e-9);
    assert_eq!(skill::percent_bias_on(&june, &observed, &calendar, |day| !in_june(day)), Some(0.0));
}

#[test]
fn the_day_of_year_mean_knows_the_season_and_nothing_else() {
    let calendar = calendar(3);
    let mut observed: Vec<f64> = calendar.iter().map(|day| f64::from(day.day_of_water_year.min(365))).collect();
    for (flow, day) in observed.iter_mut().zip(&calendar) {
        *flow += f64::from(day.water_year - 1982);
    }
    observed[5] = f64::NAN;
    let means = skill::DayOfYearMean::of(&calendar, &observed);
    assert_eq!(means.on(&calendar[10]), 11.0, "the years' differences cancel");
    assert_eq!(means.on(&calendar[5]), 6.5, "without the missing year");
    let leap = CalendarDay::new("1984-02-29".parse().unwrap(), 10);
    let nothing = skill::DayOfYearMean::of(&calendar[..30], &observed[..30]);
    assert!(nothing.on(&leap).is_nan());
}

/// Errors about `centres` in turn, each spread like the sum of three even numbers.
fn errors(centres: &[f64], spread: f64) -> Vec<f64> {
    let mut next = valleys::numbers(7);
    (0..3000).map(|day| centres[day % centres.len()] + spread * (next() + next() + next() - 1.5)).collect()
}

#[test]
fn two_humps_are_said_to_be_two_and_one_one() {
    let shape = skill::ErrorShape::of(&mut errors(&[-1.0, -1.0, 2.0], 1.0)).unwrap();
    assert!(shape.has_several_humps());
    assert_eq!(shape.humps.len(), 2, "{:?}", shape.humps);
    assert!((shape.humps[0].at + 1.0).abs() < 0.2 && (shape.humps[1].at - 2.0).abs() < 0.2);
    let step = (shape.to - shape.from) / (skill::SHAPE_POINTS - 1) as f64;
    let area: f64 = shape.density.iter().map(|density| density * step).sum();
    assert!((area - 1.0).abs() < 0.01, "a density, area {area}");

    for plain in [errors(&[0.3], 1.0), errors(&[0.0, 0.4], 1.0)] {
        assert_eq!(skill::ErrorShape::of(&mut plain.clone()).unwrap().humps.len(), 1);
    }
    // Skewed and long-tailed, as errors of flow are, but of one kind.
    let mut next = valleys::numbers(9);
    let mut skewed: Vec<f64> = (0..3000).map(|_| -libm::log(1.0 - next()) * -libm::log(1.0 - next())).collect();
    skewed.push(f64::NAN);
    assert_eq!(skill::ErrorShape::of(&mut skewed).unwrap().humps.len(), 1);

    assert_eq!(skill::ErrorShape::of(&mut [1.0; 100]), None, "no spread");
    assert_eq!(skill::ErrorShape::of(&mut errors(&[0.0], 1.0)[..29]), None, "too few");
    let mut infinite = errors(&[0.0], 1.0);
    infinite[3] = f64::INFINITY;
    assert_eq!(skill::ErrorShape::of(&mut infinite), None);
}
