//! Many years: the two stages one after the other, from stores that have settled, water year by water year.
//!
//! A record may begin and end within a water year. All its days are run; only whole water years are told.

use super::basin::{Basin, BasinDay, BasinStores};
use super::calendar::CalendarDay;
use super::ledger::{Ledger, Stores};
use super::units::M3_PER_MM_KM2;
use super::valley::Valley;
use super::weather::StationDay;
use super::works::{Evening, Works, WorksStores};

/// A whole water year of the record.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct WaterYear {
    /// Named for the calendar year in which it ends.
    pub water_year: i32,
    /// Index of its first day in the record.
    pub first: usize,
    /// Its days, 365 or 366.
    pub days: usize,
}

/// The whole water years of a record, in order.
pub fn water_years(calendar: &[CalendarDay], start_month: u8) -> impl Iterator<Item = WaterYear> {
    let starts = calendar.iter().enumerate().filter(|(_, day)| day.day_of_water_year == 1);
    starts.filter_map(move |(first, day)| {
        let rest = &calendar[first..];
        let days = rest.iter().take_while(|other| other.water_year == day.water_year).count();
        // A year that the record cuts off has no morning after it, unless its last day is the record's.
        let ended = rest.len() > days || rest[days - 1].is_last_of_water_year(start_month);
        ended.then_some(WaterYear { water_year: day.water_year, first, days })
    })
}

/// Days from the record's start to the last anniversary within `years` years: what is run first to let the stores settle.
pub fn settling_days(calendar: &[CalendarDay], years: u8) -> usize {
    let Some(first) = calendar.first() else { return 0 };
    let same = calendar.iter().enumerate().skip(1).filter(|(_, day)| day.month_day == first.month_day);
    same.take(usize::from(years)).last().map_or(0, |(index, _)| index)
}

/// Runs the first stage over the whole record into `out` (as long as the record) and returns the evening before its first
/// day, for the ledger.
pub fn run_basin(
    valley: &Valley,
    basin: &Basin<'_>,
    calendar: &[CalendarDay],
    record: &[StationDay],
    out: &mut [BasinDay],
) -> BasinDay {
    let mut stores: BasinStores<2> = basin.start();
    let settle = settling_days(calendar, valley.start.settling_years);
    basin.run(&mut stores, &calendar[..settle], &record[..settle.min(record.len())], out);
    let before = basin.evening(&stores);
    basin.run(&mut stores, calendar, record, out);
    before
}

/// The second stage's stores, settled and on the first morning of the record.
pub fn settle_works(
    valley: &Valley,
    works: &Works,
    calendar: &[CalendarDay],
    basin: &[BasinDay],
    evening: &mut Evening,
) -> Option<WorksStores> {
    let mut stores = works.start(calendar.first()?);
    let settle = settling_days(calendar, valley.start.settling_years);
    works.run(&mut stores, &calendar[..settle], basin, evening, |_, _| {});
    Some(stores)
}

/// Everything in store, m³, with the basin as in the evening of `basin`.
pub fn stores(valley: &Valley, works: &Works, basin: &BasinDay, stores: &WorksStores) -> Stores {
    let m3_per_mm = valley.band_area_km2() * M3_PER_MM_KM2;
    // In the order of `Store::ALL`.
    Stores([
        basin.snow_water_mm * m3_per_mm,
        basin.soil_mm * m3_per_mm,
        basin.ground_mm * m3_per_mm,
        basin.channel_mm * m3_per_mm,
        works.content_m3(stores),
        works.root_zones_m3(stores),
        works.returning_m3(stores),
    ])
}

/// Runs the second stage over the record. `each_day` is told every evening; `each_year` the ledger of every whole water
/// year in its last evening. `before` is the basin in the evening before the first day.
#[allow(clippy::too_many_arguments, reason = "two listeners and scratch belong to the caller, who owns the memory")]
pub fn run_works(
    valley: &Valley,
    works: &Works,
    calendar: &[CalendarDay],
    basin: &[BasinDay],
    before: &BasinDay,
    evening: &mut Evening,
    mut each_day: impl FnMut(&Evening, &WorksStores),
    mut each_year: impl FnMut(WaterYear, &Ledger),
) {
    let Some(mut works_stores) = settle_works(valley, works, calendar, basin, evening) else { return };
    let area_km2 = valley.band_area_km2();
    let mut run_days = |from: usize, to: usize, works_stores: &mut WorksStores| {
        let start_basin = if from == 0 { before } else { &basin[from - 1] };
        let mut ledger = Ledger::open(stores(valley, works, start_basin, works_stores));
        for (today, basin) in calendar[from..to].iter().zip(&basin[from..to]) {
            works.day(works_stores, today, basin, evening);
            ledger.enter(evening, area_km2);
            each_day(evening, works_stores);
        }
        if to > from {
            ledger.end = stores(valley, works, &basin[to - 1], works_stores);
        }
        ledger
    };
    let mut done = 0;
    for year in water_years(calendar, valley.water_year_start_month) {
        run_days(done, year.first, &mut works_stores);
        done = year.first + year.days;
        let ledger = run_days(year.first, done, &mut works_stores);
        each_year(year, &ledger);
    }
    run_days(done, calendar.len().min(basin.len()), &mut works_stores);
}
