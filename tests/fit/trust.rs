//! What a judgement says of series that are made up so that the right answer is known.

use deshielo::fit::trust::verdict::{Evidence, rule};
use deshielo::fit::trust::{FlowTrust, Known, Need, SnowLink, StoreTrust, Use, YearSkill, crossed, late_summer_months};
use deshielo::fit::{Half, Parting, Scores, SplitTest, Transfer};
use deshielo::water::calendar::CalendarDay;

use super::valleys;

/// Eight years of a river with a spring flood, larger in some years than in others.
fn river() -> (Vec<CalendarDay>, Vec<f64>) {
    let calendar = valleys::record(&valleys::bare_basin(1), 8, 1).0;
    let flow = |day: &CalendarDay| {
        let at = (f64::from(day.day_of_water_year) - 235.0) / 30.0;
        let size = 1.0 + 0.3 * f64::from(day.water_year % 4);
        2.0 + 30.0 * size * libm::exp(-0.5 * at * at)
    };
    let flows = calendar.iter().map(flow).collect();
    (calendar, flows)
}

fn judge(calendar: &[CalendarDay], modelled: &[f64], observed: &[f64]) -> FlowTrust {
    FlowTrust::of(calendar, 10, modelled, observed, late_summer_months(false)).unwrap()
}

fn half(water_years: Vec<i32>, fitted: f64, judged: f64) -> Half {
    let scores = |score| Scores { objective: Some(score), kling_gupta: Some(score), ..Scores::default() };
    Half {
        water_years,
        mean_temperature_c: 5.0,
        values: Vec::new(),
        fitted: scores(fitted),
        judged: scores(judged),
        guess_kling_gupta: Some(0.4),
    }
}

fn tests(judged: f64) -> Vec<SplitTest> {
    [Parting::EarlierLater, Parting::ColderWarmer]
        .map(|parting| SplitTest {
            parting,
            halves: [half((1981..=1984).collect(), 0.9, judged), half((1985..=1988).collect(), 0.9, judged)],
        })
        .into()
}

fn known(evidence: &Evidence<'_>, of: Use) -> Option<Known> {
    rule(evidence).into_iter().find(|ruling| ruling.of == of).map(|ruling| ruling.known())
}

#[test]
fn a_perfect_model_may_be_used_for_everything_that_was_measured() {
    let (calendar, observed) = river();
    let flow = judge(&calendar, &observed, &observed);
    assert_eq!((flow.half_day_error(), flow.annual_error_percent(), flow.years.len()), (Some(0.0), Some(0.0), 8));
    assert_eq!(flow.annual.unwrap().nash_sutcliffe, Some(1.0));
    let tests = tests(0.88);
    let lake = StoreTrust::of(&calendar, 10, &observed, &observed).unwrap();
    let evidence = Evidence {
        flow: Some(&flow),
        tests: &tests,
        storage: Some((&lake, 50.0)),
        has_lake: true,
        canals: &[],
        has_canals: true,
    };
    for of in [Use::Direction, Use::Timing, Use::Volume, Use::LateSummer, Use::Storage] {
        assert_eq!(known(&evidence, of), Some(Known::Yes), "{of:?}");
    }
    let rulings = rule(&evidence);
    let deliveries = rulings.iter().find(|ruling| ruling.of == Use::Deliveries).unwrap();
    assert_eq!((deliveries.known(), deliveries.value), (Known::Unknown, Err(Need::DiversionRecord)));
    let bare = Evidence { has_lake: false, has_canals: false, storage: None, ..evidence };
    assert_eq!(known(&bare, Use::Storage), None, "no lake, no verdict on one");
}

#[test]
fn each_verdict_follows_its_own_score() {
    let (calendar, observed) = river();
    let with = |flow: &FlowTrust, of| {
        let tests = tests(0.88);
        let evidence =
            Evidence { flow: Some(flow), tests: &tests, storage: None, has_lake: true, canals: &[], has_canals: false };
        known(&evidence, of)
    };
    // A fifth too much all year: the season is right, the volume is not.
    let more: Vec<f64> = observed.iter().map(|flow| flow * 1.15).collect();
    let flow = judge(&calendar, &more, &observed);
    assert_eq!((with(&flow, Use::Volume), with(&flow, Use::Timing)), (Some(Known::Partly), Some(Known::Yes)));
    assert!((flow.daily.percent_bias.unwrap() + 15.0).abs() < 1e-9, "too much is negative, as published");
    // Twenty days late: the volume is right, the timing is not.
    let mut late = observed.clone();
    late.rotate_right(20);
    let flow = judge(&calendar, &late, &observed);
    assert_eq!((with(&flow, Use::Volume), with(&flow, Use::Timing)), (Some(Known::Yes), Some(Known::No)));
    // The low flow of the year before comes along, which may move a day by one.
    let shift = |year: &YearSkill| year.modelled_half_day.abs_diff(year.observed_half_day + 20);
    assert!(flow.years.iter().skip(1).all(|year| shift(year) <= 1));
    // Half of the low flow missing: only late summer suffers.
    let dry: Vec<f64> = observed.iter().map(|flow| if *flow < 6.0 { flow * 0.5 } else { *flow }).collect();
    let flow = judge(&calendar, &dry, &observed);
    assert_eq!((with(&flow, Use::Volume), with(&flow, Use::LateSummer)), (Some(Known::Yes), Some(Known::No)));
    assert!(flow.low_flow_bias.unwrap() > 45.0 && flow.high_flow_bias.unwrap().abs() < 1e-9);
    assert_eq!(with(&flow, Use::Storage), Some(Known::Unknown));
}

#[test]
fn low_flows_under_and_storms_over_are_two_humps() {
    let (calendar, observed) = river();
    let mut noise = valleys::numbers(3);
    let mut noisy = |factor: f64| factor * libm::exp(0.15 * (noise() + noise() + noise() - 1.5));
    let two: Vec<f64> = observed.iter().map(|flow| flow * noisy(if *flow < 6.0 { 0.55 } else { 1.6 })).collect();
    let errors = judge(&calendar, &two, &observed).errors.unwrap();
    assert_eq!(errors.humps.len(), 2, "{:?}", errors.humps);
    assert!(errors.humps[0].at < -0.4 && errors.humps[1].at > 0.3);
    let plain: Vec<f64> = observed.iter().map(|flow| flow * noisy(1.1)).collect();
    assert_eq!(judge(&calendar, &plain, &observed).errors.unwrap().humps.len(), 1);
}

#[test]
fn a_change_of_regime_takes_the_direction_away() {
    let (calendar, observed) = river();
    let flow = judge(&calendar, &observed, &observed);
    let direction = |tests: &[SplitTest]| {
        let evidence =
            Evidence { flow: Some(&flow), tests, storage: None, has_lake: false, canals: &[], has_canals: false };
        known(&evidence, Use::Direction)
    };
    assert_eq!(direction(&tests(0.88)), Some(Known::Yes));
    assert_eq!(direction(&tests(0.7)), Some(Known::Partly));
    assert_eq!(direction(&tests(0.5)), Some(Known::No));
    assert_eq!(direction(&[]), Some(Known::Unknown));
    // Warm and cold years agree, earlier and later ones do not: what changed is not the weather.
    let mut broken = tests(0.88);
    broken[0].halves[1] = half((1985..=1988).collect(), 0.9, 0.1);
    assert_eq!(broken[0].transfer(), Transfer::Fails);
    assert_eq!(direction(&broken), Some(Known::No));
}

#[test]
fn years_are_crossed() {
    let (calendar, _) = river();
    let days = calendar.len();
    let (first, second) = (vec![1.0; days], vec![2.0; days]);
    let mut test = tests(0.9).remove(0);
    test.halves[1].water_years.pop();
    let series = crossed(&test, &calendar, [&first, &second]);
    let of = |water_year| series[calendar.iter().position(|day| day.water_year == water_year).unwrap()];
    assert_eq!((of(1981), of(1984), of(1985)), (2.0, 2.0, 1.0));
    assert!(of(1988).is_nan(), "a year in neither half");
}

#[test]
fn the_guess_has_not_seen_the_year_that_it_guesses() {
    let (calendar, observed) = river();
    let flow = judge(&calendar, &observed, &observed);
    let guess = flow.guess.nash_sutcliffe.unwrap();
    // The day-of-year mean over all years would know a part of each; here the years differ much, so it must score less.
    let usual = deshielo::signs::skill::DayOfYearMean::of(&calendar, &observed);
    let all: Vec<f64> = calendar.iter().map(|day| usual.on(day)).collect();
    assert!(guess < deshielo::signs::skill::nash_sutcliffe(&all, &observed).unwrap());
}

#[test]
fn gaps_are_left_out_and_a_broken_year_is_not_told() {
    let (calendar, observed) = river();
    let mut gappy = observed.clone();
    gappy[400..460].fill(f64::NAN);
    gappy[..200].fill(f64::NAN);
    let flow = judge(&calendar, &observed, &gappy);
    assert_eq!(flow.days, observed.len() - 260);
    assert_eq!(flow.years.len(), 6);
    assert_eq!(flow.daily.nash_sutcliffe, Some(1.0));
    assert!(FlowTrust::of(&calendar, 10, &observed, &vec![f64::NAN; observed.len()], [8, 9]).is_none());
}

#[test]
fn an_error_that_comes_with_the_snow_is_told_from_one_that_does_not() {
    let (calendar, observed) = river();
    let factors = [1.3, 0.8, 1.1, 0.9, 1.2, 0.7, 1.0, 1.15];
    let of = |day: &CalendarDay| factors[(day.water_year - 1981) as usize];
    let modelled: Vec<f64> = observed.iter().zip(&calendar).map(|(flow, day)| flow * of(day)).collect();
    let flow = judge(&calendar, &modelled, &observed);
    let peaks = |with: &dyn Fn(usize) -> f64| -> Vec<(i32, f64, f64)> {
        (0..8).map(|year| (1981 + year as i32, 300.0 * with(year), 300.0)).collect()
    };
    let same = SnowLink::of(&peaks(&|year| factors[year]), &flow.years).unwrap();
    assert!(same.correlation > 0.9 && same.years == 8, "{same:?}");
    let other = SnowLink::of(&peaks(&|year| factors[(year + 3) % 8]), &flow.years).unwrap();
    assert!(other.correlation < 0.5, "{other:?}");
    assert_eq!(SnowLink::of(&peaks(&|_| 1.0), &flow.years), None, "an error that does not vary tells nothing");
    assert_eq!(SnowLink::of(&peaks(&|year| factors[year])[..4], &flow.years), None, "too few years");
}
