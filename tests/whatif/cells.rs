//! Cells against whole runs, parts against the whole, and the flag that ends the work.

use std::sync::Mutex;
use std::sync::atomic::{AtomicBool, AtomicUsize, Ordering};
use std::time::{Duration, Instant};

use deshielo::signs::{Reading, YearSigns, read_run};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::valley::Valley;
use deshielo::water::weather::StationDay;
use deshielo::water::works::Works;
use deshielo::whatif::{Axis, Question, Source, WhatIfFault};

use super::support::valleys;

struct Land {
    valley: Valley,
    calendar: Vec<CalendarDay>,
    record: Vec<StationDay>,
}

impl Land {
    fn new(years: i32) -> Self {
        let valley = valleys::whole_valley();
        let (calendar, record) = valleys::record(&valley, years, 7);
        Self { valley, calendar, record }
    }

    fn source(&self) -> Source<'_> {
        Source { valley: &self.valley, calendar: &self.calendar, record: &self.record }
    }

    /// The signs of every year, from one run alone.
    fn years(&self, dials: &Dials) -> Vec<YearSigns> {
        let mut basin = vec![BasinDay::default(); self.record.len()];
        let slopes = Basin::new(&self.valley, dials);
        let before = run_basin(&self.valley, &slopes, &self.calendar, &self.record, &mut basin);
        let works = Works::new(&self.valley, dials).unwrap();
        let mut years = Vec::new();
        read_run(&self.valley, &works, &self.calendar, &basin, &before, |_, _| {}, |year| years.push(year.signs));
        years
    }
}

fn axis(dial: Dial, from: f64, to: f64, step: f64) -> Axis {
    Axis::new(dial, from, to, step).unwrap()
}

fn bits(values: &[Option<f64>]) -> Vec<Option<u64>> {
    values.iter().map(|value| value.map(f64::to_bits)).collect()
}

static NEVER: AtomicBool = AtomicBool::new(false);

#[test]
fn every_cell_is_a_run_of_its_own_to_the_bit() {
    let land = Land::new(4);
    let warming = || axis(Dial::Warming, 0.0, 5.0, 1.0);
    let winter = || axis(Dial::WinterPrecipitation, -20.0, 20.0, 10.0);
    let lining = || axis(Dial::CanalLining, 0.0, 100.0, 50.0);
    let sides = [[warming(), winter()], [lining(), warming()], [axis(Dial::Diversion, -20.0, 20.0, 20.0), lining()]];
    let readings =
        [("supply_ratio", None), ("peak_swe_mm", None), ("reliability", Some(1)), ("last_full_date", Some(0))];
    for sides in sides {
        let base = Dials::REST.with(Dial::SummerPrecipitation, -10.0);
        let questions = readings.map(|(key, gate)| {
            let reading = Reading::from_key(key, gate).unwrap();
            Question::new(land.source(), base, sides.clone(), reading, &[0, 1, 3]).unwrap()
        });
        let answers =
            questions.each_ref().map(|question| question.run(0..question.cells(), &NEVER, |_, _| {}).unwrap());
        for cell in 0..questions[0].cells() {
            let mut years = land.years(&questions[0].dials_of(cell));
            years.remove(2);
            for (question, answer) in questions.iter().zip(&answers) {
                let alone = question.reading().of(&years, land.valley.enough_share, false);
                assert_eq!(answer[cell].map(f64::to_bits), alone.map(f64::to_bits), "{:?} {cell}", question.reading());
            }
        }
        let first = &answers[0];
        assert!(first.iter().any(|value| *value != first[0]), "all cells alike test nothing");
        let rest = land.years(&Dials::REST);
        let rest = [&rest[0], &rest[1], &rest[3]];
        let alone = questions[0].reading().of(rest, land.valley.enough_share, false);
        assert_eq!(questions[0].as_it_was(&NEVER), Ok(alone));
    }
}

#[test]
fn parts_make_the_whole_and_every_cell_is_told_once() {
    let land = Land::new(3);
    for sides in [
        [axis(Dial::Warming, 0.0, 3.0, 0.5), axis(Dial::WinterPrecipitation, -20.0, 20.0, 10.0)],
        [axis(Dial::Warming, 0.0, 3.0, 0.5), axis(Dial::TownGrowth, 0.0, 100.0, 25.0)],
    ] {
        let reading = Reading::from_key("supply_ratio", None).unwrap();
        let question = Question::new(land.source(), Dials::REST, sides, reading, &[0, 1, 2]).unwrap();
        let told = Mutex::new(Vec::new());
        let whole = question.run(0..question.cells(), &NEVER, |cell, value| told.lock().unwrap().push((cell, value)));
        let whole = whole.unwrap();
        let mut told = told.into_inner().unwrap();
        let sketch: Vec<usize> = told.iter().take(4).map(|(cell, _)| *cell).collect();
        assert!(sketch.iter().all(|cell| cell % 7 % 4 == 0), "the first cells are no sketch: {sketch:?}");
        told.sort_by_key(|(cell, _)| *cell);
        assert_eq!(told, whole.iter().copied().enumerate().collect::<Vec<_>>());
        for parts in [1, 2, 3, 7, 35, 40] {
            let pieces = (1..=parts).map(|part| question.part(part, parts).unwrap());
            let joined: Vec<_> = pieces.flat_map(|cells| question.run(cells, &NEVER, |_, _| {}).unwrap()).collect();
            assert_eq!(bits(&joined), bits(&whole), "{parts} parts");
        }
        assert_eq!((question.part(0, 3), question.part(4, 3), question.part(1, 0)), (None, None, None));
        assert_eq!(question.run(30..36, &NEVER, |_, _| {}), Err(WhatIfFault::NoSuchCells));
    }
}

#[test]
fn a_flag_ends_the_work_at_once() {
    let land = Land::new(40);
    let sides = [axis(Dial::Warming, 0.0, 6.0, 0.05), axis(Dial::WinterPrecipitation, -50.0, 50.0, 1.0)];
    let reading = Reading::from_key("supply_ratio", None).unwrap();
    let question = Question::new(land.source(), Dials::REST, sides, reading, &(0..40).collect::<Vec<_>>()).unwrap();
    let (cancel, told) = (AtomicBool::new(false), AtomicUsize::new(0));
    let took = std::thread::scope(|scope| {
        let work = scope.spawn(|| {
            question.run(0..question.cells(), &cancel, |_, _| {
                told.fetch_add(1, Ordering::Relaxed);
            })
        });
        while told.load(Ordering::Relaxed) < 3 {
            std::thread::sleep(Duration::from_millis(1));
        }
        let start = Instant::now();
        cancel.store(true, Ordering::Relaxed);
        assert_eq!(work.join().unwrap(), Err(WhatIfFault::Cancelled));
        start.elapsed()
    });
    println!("cancelled in {took:?}");
    // The aim is 50 ms on a quiet machine; tests run beside others.
    assert!(took < Duration::from_millis(500), "{took:?}");
    assert!(told.load(Ordering::Relaxed) < question.cells() / 2);
}

#[test]
fn questions_that_make_no_sense_are_refused() {
    let land = Land::new(2);
    let reading = Reading::from_key("supply_ratio", None).unwrap();
    let sides = || [axis(Dial::Warming, 0.0, 3.0, 0.5), axis(Dial::Diversion, 0.0, 50.0, 25.0)];
    let ask = |sides, reading, base, years: &[usize]| Question::new(land.source(), base, sides, reading, years).err();
    let rest = Dials::REST;
    assert_eq!(ask(sides(), reading, rest, &[0, 1]), None);
    let same = [axis(Dial::Warming, 0.0, 3.0, 0.5), axis(Dial::Warming, 0.0, 3.0, 0.5)];
    assert_eq!(ask(same, reading, rest, &[0]), Some(WhatIfFault::SameDial));
    for years in [&[][..], &[2], &[1, 0], &[0, 0]] {
        assert_eq!(ask(sides(), reading, rest, years), Some(WhatIfFault::Years), "{years:?}");
    }
    let nowhere = Reading::from_key("days_full", Some(99)).unwrap();
    assert_eq!(ask(sides(), nowhere, rest, &[0]), Some(WhatIfFault::NoSuchGate));
    let nan = Dials { canal_lining: f64::NAN, ..rest };
    assert_eq!(ask(sides(), reading, nan, &[0]), Some(WhatIfFault::NotFinite(Dial::CanalLining)));
    let vast = [axis(Dial::Warming, 0.0, 5.99, 0.01), axis(Dial::Diversion, -50.0, 100.0, 0.25)];
    assert_eq!(ask(vast, reading, rest, &[0]), Some(WhatIfFault::TooMany));
    let short = Source { record: &land.record[1..], ..land.source() };
    assert_eq!(Question::new(short, rest, sides(), reading, &[0]).err(), Some(WhatIfFault::Lengths));
}
