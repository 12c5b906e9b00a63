//! Answers are those of a fresh run, whatever was turned before.

use super::host::{everything, random_event};
use super::valleys;
use deshielo::session::answer::{AnswerFault, Asked, Progress, Source, Supply, compare};
use deshielo::session::*;
use deshielo::signs::{Sign, read_run};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::units::{M3_PER_HM3, SECONDS_PER_DAY};
use deshielo::water::valley::Valley;
use deshielo::water::weather::StationDay;
use deshielo::water::works::Works;
use std::sync::Arc;

/// A valley with its record, which outlive the answers.
struct Ground {
    valley: Valley,
    calendar: Vec<CalendarDay>,
    record: Vec<StationDay>,
}

impl Ground {
    fn new(valley: Valley, years: i32, seed: u32) -> Self {
        let (calendar, record) = valleys::record(&valley, years, seed);
        Self { valley, calendar, record }
    }

    /// Without its first `from` days and its last `less`.
    fn cut(mut self, from: usize, less: usize) -> Self {
        let to = self.calendar.len() - less;
        self.calendar = self.calendar[from..to].to_vec();
        self.record = self.record[from..to].to_vec();
        self
    }

    fn source(&self) -> Source<'_> {
        Source { valley: &self.valley, calendar: &self.calendar, record: &self.record }
    }

    fn offer(&self, answers: &Answers) -> Offer {
        let years = YearList::of(&answers.rest().run.years).unwrap();
        Offer::new(OfferInput { years, settings: Vec::new(), ..everything() }).unwrap()
    }

    /// A run from nothing must be the same to the bit. What is printed tells every number apart, −0 from 0 too.
    fn assert_fresh(&self, answer: &answer::Answer, dials: &Dials) {
        let fresh = valleys::run(&self.valley, dials, &self.calendar, &self.record);
        assert_eq!(answer.run.dials, *dials);
        assert_eq!(format!("{:?}", answer.run.years), format!("{:?}", fresh.years), "{dials:?}");
        assert_eq!(format!("{:?}", answer.run.basin_days()), format!("{:?}", fresh.basin));
    }

    /// The year that is looked into must be that of the whole run to the bit, and the strips must count as the signs do.
    fn assert_year(&self, answer: &answer::Answer) {
        let (detail, run) = (&answer.year, &answer.run);
        let days = detail.year.first..detail.year.first + detail.year.days;
        let works = Works::new(&self.valley, &run.dials).unwrap();
        let basin = Basin::new(&self.valley, &run.dials);
        let mut fresh = vec![BasinDay::default(); self.record.len()];
        let before = run_basin(&self.valley, &basin, &self.calendar, &self.record, &mut fresh);
        let mut day = 0;
        read_run(
            &self.valley,
            &works,
            &self.calendar,
            &fresh,
            &before,
            |evening, stores| {
                if days.contains(&day) {
                    let at = day - days.start;
                    let shown = &detail.days[at];
                    let same = |got: f64, want: f64| assert_eq!(got.to_bits(), want.to_bits(), "day {at}");
                    same(shown.inflow_m3s, evening.basin.inflow_m3 / SECONDS_PER_DAY);
                    same(shown.river_out_m3s, evening.river.river_out_m3 / SECONDS_PER_DAY);
                    same(shown.content_hm3, evening.content_m3 / M3_PER_HM3);
                    same(shown.minimum_m3s, evening.minimum_m3 / SECONDS_PER_DAY);
                    assert_eq!(shown.minimum_met, evening.river.minimum_met);
                    for (gate, days) in detail.gates.iter().enumerate() {
                        same(days[at].demand_m3s, evening.demand_m3[gate] / SECONDS_PER_DAY);
                        same(days[at].delivered_m3s, evening.river.canal_m3[gate] / SECONDS_PER_DAY);
                        same(days[at].account_hm3, stores.river.account_m3[gate] / M3_PER_HM3);
                        same(days[at].crop_evaporation_m3, evening.fields[gate].crop_evaporation_m3);
                    }
                    let areas = self.valley.bands.iter().map(|band| band.area_km2 / self.valley.band_area_km2());
                    let mean: f64 = areas.zip(detail.band_snow_mm(at)).map(|(share, snow)| share * snow).sum();
                    let whole = evening.basin.snow_water_mm;
                    assert!((mean - whole).abs() <= 1e-9 * whole.max(1.0), "bands {mean} mm, basin {whole} mm");
                }
                day += 1;
            },
            |_| {},
        );
        for (gate, signs) in run.years[detail.index].signs.canals.iter().enumerate() {
            let count = |supply| detail.gates[gate].iter().filter(|day| day.supply == Some(supply)).count() as u16;
            assert_eq!(
                (count(Supply::Full), count(Supply::Short), count(Supply::Cut)),
                (signs.days_full, signs.days_short, signs.days_cut),
                "gate {gate}"
            );
        }
    }
}

fn walk(ground: &Ground, seed: u32, events: usize, checks: usize) {
    let source = ground.source();
    let mut answers = Answers::new(&source).unwrap();
    let offer = ground.offer(&answers);
    let mut state = State::new(&offer);
    assert_eq!(Asked::from(state.shown()), *answers.asked(), "both begin with the middling year");
    let mut next = valleys::numbers(seed);
    let mut pending = Needs::default();
    for number in 1..=events {
        pending = pending.and(state.step(random_event(&mut next), &offer));
        // A slow board answers now and then; the questions in between are skipped.
        if !pending.answer() || next() < 0.5 {
            continue;
        }
        assert!(answers.ask(Asked::from(state.shown())));
        answers.finish(&source).unwrap();
        pending = Needs::default();
        if number % (events / checks).max(1) == 0 {
            ground.assert_fresh(answers.dialled(), &state.shown().dials);
        }
    }
    assert!(answers.ask(Asked::from(state.shown())));
    answers.finish(&source).unwrap();
    ground.assert_fresh(answers.rest(), &Dials::REST);
    ground.assert_fresh(answers.dialled(), &state.shown().dials);
    assert_eq!(answers.beside().is_some(), state.shown().beside.is_some());
    for (answer, dials) in answers.beside().into_iter().zip(state.shown().beside) {
        ground.assert_fresh(answer, &dials);
    }
    for answer in [answers.rest(), answers.dialled()].into_iter().chain(answers.beside()) {
        assert_eq!(answer.year.index, state.shown().year_index);
        ground.assert_year(answer);
    }
    // Reset: rest is the run as it was itself, not one like it.
    state.step(Event::LongPress, &offer);
    answers.ask(Asked::from(state.shown()));
    answers.finish(&source).unwrap();
    assert!(Arc::ptr_eq(&answers.dialled().run, &answers.rest().run));
    assert!(Arc::ptr_eq(&answers.dialled().year, &answers.rest().year));
}

#[test]
fn after_any_turns_the_answer_is_that_of_a_fresh_run() {
    let ground = Ground::new(valleys::whole_valley(), 6, 4);
    for seed in 0..6 {
        walk(&ground, seed, 300, 20);
    }
    // A record that begins and ends within a water year.
    walk(&Ground::new(valleys::whole_valley(), 6, 4).cut(100, 30), 77, 300, 20);
}

#[test]
fn in_any_place() {
    for seed in 0..24_u32 {
        let (valley, _) = valleys::random_valley(seed.wrapping_mul(2_654_435_761));
        walk(&Ground::new(valley, 4, seed), seed, 60, 4);
    }
}

#[test]
fn the_old_answer_stands_until_the_new_one_is_there() {
    let ground = Ground::new(valleys::whole_valley(), 5, 2);
    let source = ground.source();
    let mut answers = Answers::new(&source).unwrap();
    assert!(answers.is_current());
    let warm = Dials::REST.with(Dial::Warming, 3.0);
    let thirsty = Dials::REST.with(Dial::Diversion, 50.0);
    let asked = Asked { dials: warm, beside: Some(thirsty), year: answers.asked().year };
    assert!(answers.ask(asked));
    let drawn = answers.clone();
    assert!(!answers.is_dialled_current() && answers.dialled().run.dials == Dials::REST);
    assert_eq!(answers.work(&source), Ok(Progress::More));
    assert!(answers.is_dialled_current() && !answers.is_current() && answers.beside().is_none());
    assert_eq!(answers.work(&source), Ok(Progress::Done));
    assert_eq!(answers.beside().unwrap().run.dials, thirsty);
    assert_eq!(drawn.dialled().run.dials, Dials::REST, "who draws keeps the old one");

    let year = (asked.year + 1) % 5;
    assert!(answers.ask(Asked { year, ..asked }));
    assert!(!answers.is_current());
    let runs = (Arc::clone(&answers.dialled().run), Arc::clone(&answers.rest().run));
    answers.finish(&source).unwrap();
    assert!(Arc::ptr_eq(&runs.0, &answers.dialled().run) && Arc::ptr_eq(&runs.1, &answers.rest().run));
    assert_eq!((answers.rest().year.index, answers.dialled().year.index), (year, year));

    let before = *answers.asked();
    assert!(!answers.ask(Asked { year: 5, ..asked }), "no such year");
    assert!(!answers.ask(Asked { dials: Dials::REST.with(Dial::Warming, f64::NAN), ..asked }));
    assert_eq!((*answers.asked(), answers.is_current()), (before, true));
    let short = Source { record: &ground.record[1..], ..source };
    assert_eq!(Answers::new(&short).unwrap_err(), AnswerFault::Lengths);
    let half = Source { record: &ground.record[..200], calendar: &ground.calendar[..200], ..source };
    assert_eq!(Answers::new(&half).unwrap_err(), AnswerFault::NoWholeYear);
}

#[test]
fn forty_years_leave_the_kiosk_seven_of_its_sixteen_megabytes() {
    let ground = Ground::new(valleys::whole_valley(), 40, 1);
    let source = ground.source();
    let mut answers = Answers::new(&source).unwrap();
    let year = answers.asked().year;
    let warm = |by| Dials::REST.with(Dial::Warming, by);
    for (dialled, beside) in [(1.0, 2.0), (3.0, 1.0), (5.0, 6.0)] {
        answers.ask(Asked { dials: warm(dialled), beside: Some(warm(beside)), year });
        answers.finish(&source).unwrap();
        // Three runs under three weathers are the most that there is.
        let bytes = answers.bytes();
        println!("three runs of 40 years hold {bytes} bytes");
        assert!((4_000_000..9_000_000).contains(&bytes), "{bytes} bytes");
    }
}

#[test]
fn changes_are_told_year_by_year() {
    let ground = Ground::new(valleys::whole_valley(), 8, 3);
    let source = ground.source();
    let mut answers = Answers::new(&source).unwrap();
    let dials = Dials::REST.with(Dial::Warming, 4.0).with(Dial::Diversion, 40.0);
    answers.ask(Asked { dials, ..*answers.asked() });
    answers.finish(&source).unwrap();
    let (before, after) = (&answers.rest().run.years, &answers.dialled().run.years);

    let changes = compare::year_changes(&before[2].signs, &after[2].signs);
    let half = changes[Sign::HalfVolumeDate as usize];
    let days = |year: &deshielo::signs::YearReport| f64::from(year.signs.half_volume_date.unwrap().day_of_water_year);
    assert_eq!(half.change(), Some(days(&after[2]) - days(&before[2])));
    assert!(half.change().unwrap() < 0.0, "with less snow half of the water is past sooner");
    assert_eq!(compare::Pair { before: None, after: Some(1.0) }.change(), None);

    let all = compare::all_years(before, after);
    let by_hand: Vec<f64> = before.iter().zip(after).map(|(b, a)| days(a) - days(b)).collect();
    let change = all[Sign::HalfVolumeDate as usize].change.unwrap();
    assert_eq!((change.mean, change.years), (by_hand.iter().sum::<f64>() / 8.0, 8));
    assert_eq!(change.least, by_hand.iter().copied().fold(f64::INFINITY, f64::min));
    let fill = all[Sign::FillDate as usize];
    let filled = |years: &[deshielo::signs::YearReport]| years.iter().filter(|y| y.signs.fill_date.is_some()).count();
    assert_eq!(fill.before.map_or(0, |spread| spread.years), filled(before));
    assert_eq!(filled(before) + fill.come, filled(after) + fill.gone);

    let canals = compare::canal_changes(&before[2].signs, &after[2].signs);
    assert_eq!(canals.len(), 5);
    let canal = &after[2].signs.canals[2];
    assert_eq!(canals[2].days_full.after, Some(f64::from(canal.days_full)));
    assert_eq!(canals[2].supply_ratio.after, canal.supply_ratio);
    assert!(canals[0].demand_hm3.change().unwrap() > 0.0);

    let supply = compare::supply_of_all(before, after, 0.9);
    let enough = |years: &[deshielo::signs::YearReport]| {
        years.iter().filter(|year| year.signs.supply_ratio.is_some_and(|ratio| ratio >= 0.9)).count() as f64 / 8.0
    };
    assert_eq!(supply.before.unwrap().reliability, enough(before));
    assert_eq!(supply.after.unwrap().reliability, enough(after));
    assert!(compare::supply_of_canal(before, after, 4, 0.9).is_some());
    assert!(compare::supply_of_canal(before, after, 5, 0.9).is_none());
    let same = compare::all_years(before, before);
    assert!(same.iter().filter_map(|sign| sign.change).all(|change| change.least == 0.0 && change.most == 0.0));
}
