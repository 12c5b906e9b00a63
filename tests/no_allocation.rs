//! Nothing is allocated inside a day: a counting allocator watches basin, works and signs on the costliest places.
#![allow(unsafe_code, reason = "an allocator cannot be written without")]

#[path = "support/valleys.rs"]
mod valleys;

use std::alloc::{GlobalAlloc, Layout, System};
use std::cell::Cell;

use deshielo::signs::{YearReader, read_run};
use deshielo::water::basin::{Basin, BasinDay, Basins};
use deshielo::water::canals::SharingRule;
use deshielo::water::dials::Dials;
use deshielo::water::run::run_basin;
use deshielo::water::valley::{MOST_BANDS, Purpose, Valley};
use deshielo::water::works::{Evening, Works};

thread_local! {
    // Of this thread alone: the test harness allocates beside us.
    static ALLOCATIONS: Cell<usize> = const { Cell::new(0) };
}

struct Counting;

// SAFETY: everything is passed on to the system's allocator unchanged; counting allocates nothing.
unsafe impl GlobalAlloc for Counting {
    unsafe fn alloc(&self, layout: Layout) -> *mut u8 {
        ALLOCATIONS.with(|count| count.set(count.get() + 1));
        // SAFETY: the caller's promises are passed on.
        unsafe { System.alloc(layout) }
    }

    unsafe fn dealloc(&self, pointer: *mut u8, layout: Layout) {
        // SAFETY: the caller's promises are passed on.
        unsafe { System.dealloc(pointer, layout) }
    }

    unsafe fn realloc(&self, pointer: *mut u8, layout: Layout, new_size: usize) -> *mut u8 {
        ALLOCATIONS.with(|count| count.set(count.get() + 1));
        // SAFETY: the caller's promises are passed on.
        unsafe { System.realloc(pointer, layout, new_size) }
    }
}

#[global_allocator]
static COUNTING: Counting = Counting;

/// Allocations of this thread while `run` runs.
fn allocations(run: impl FnOnce()) -> usize {
    let before = ALLOCATIONS.with(Cell::get);
    run();
    ALLOCATIONS.with(Cell::get) - before
}

/// How much there is to do in a day.
fn cost(valley: &Valley) -> usize {
    let fields = |purpose: &Purpose| match purpose {
        Purpose::Fields(fields) => fields.len(),
        Purpose::Town(_) => 1,
    };
    valley.bands.len() + valley.gates.iter().map(|gate| 1 + fields(&gate.purpose)).sum::<usize>()
}

/// Of many random places the costliest under each rule, all with a reservoir.
fn costliest() -> Vec<(Valley, Dials)> {
    let rules = [SharingRule::Seniority, SharingRule::Proportional, SharingRule::Rotation];
    let places: Vec<(Valley, Dials)> = (0..600).map(|seed| valleys::random_valley(seed * 7_919)).collect();
    let of_rule = |rule| {
        let of_rule = places.iter().filter(|place| place.0.rule == rule && place.0.reservoir.is_some());
        of_rule.max_by_key(|place| cost(&place.0)).unwrap().clone()
    };
    rules.into_iter().map(of_rule).collect()
}

#[test]
fn the_counter_counts() {
    assert_eq!(allocations(|| drop(std::hint::black_box(Box::new([1_u8; 64])))), 1);
    assert_eq!(allocations(|| assert_eq!(std::hint::black_box(2) * 2, 4)), 0);
}

#[test]
fn the_places_are_costly() {
    for (valley, _) in costliest() {
        assert!(valley.gates.len() >= 20 && valley.bands.len() >= 20, "{:?}: {}", valley.rule, cost(&valley));
        assert!(cost(&valley) >= 120, "{:?}: {}", valley.rule, cost(&valley));
    }
}

#[test]
fn a_day_of_basin_works_and_signs_allocates_nothing() {
    for (mut valley, dials) in costliest() {
        valley.bands = valleys::bare_basin(MOST_BANDS).bands;
        let (calendar, record) = valleys::record(&valley, 3, 8);
        let mut days = vec![BasinDay::default(); record.len()];

        let basin = Basin::new(&valley, &dials);
        let mut stores = basin.start();
        assert_eq!(allocations(|| basin.run(&mut stores, &calendar, &record, &mut days)), 0, "basin");
        assert!(days.iter().any(|day| day.inflow_m3 > 0.0));

        let works = Works::new(&valley, &dials).unwrap();
        let (mut stores, mut evening) = (works.start(&calendar[0]), Evening::default());
        let mut reader = YearReader::new(&valley);
        for (today, day) in calendar[..366].iter().zip(&days) {
            let count = allocations(|| works.day(&mut stores, today, day, &mut evening));
            assert_eq!(count, 0, "{:?}, works on {:?}", valley.rule, today.month_day);
            assert_eq!(allocations(|| reader.day(&evening, &stores)), 0, "signs on {:?}", today.month_day);
        }
        let mut closed = None;
        assert_eq!(allocations(|| closed = Some(reader.close())), 0, "the year's signs");
        assert!(closed.unwrap().canals.iter().any(|canal| canal.delivered_hm3 > 0.0));
    }
}

#[test]
fn nor_does_a_whole_run_or_settings_side_by_side() {
    for (valley, dials) in costliest() {
        let (calendar, record) = valleys::record(&valley, 3, 8);
        let mut days = vec![BasinDay::default(); record.len()];
        let basin = Basin::new(&valley, &dials);
        let works = Works::new(&valley, &dials).unwrap();
        let mut years = 0;
        let count = allocations(|| {
            let before = run_basin(&valley, &basin, &calendar, &record, &mut days);
            read_run(&valley, &works, &calendar, &days, &before, |_, _| {}, |_| years += 1);
        });
        assert_eq!((count, years), (0, 3), "{:?}", valley.rule);

        let basins = Basins::<4>::new([&valley; 4], [&dials; 4]);
        let mut lanes = [(); 4].map(|()| days.clone());
        let mut slices = lanes.each_mut().map(Vec::as_mut_slice);
        let mut stores = basins.start();
        assert_eq!(allocations(|| basins.run(&mut stores, &calendar, &record, &mut slices)), 0, "side by side");
    }
}
