//! A real station record: our reference evaporation beside an independent library's, day by day and as a whole.
//!
//! `station/ORIGIN.md` says where the record and the library's values come from.
#![cfg(feature = "std")]

use deshielo::water::evaporation::air::saturation_vapour_pressure_kpa;
use deshielo::water::evaporation::radiation::{INTERIOR_SOLAR_RANGE_COEFFICIENT, MM_PER_MJ_M2};
use deshielo::water::evaporation::{
    EvaporationDay, LATENT_HEAT_OF_VAPORISATION_MJ_KG, Method, PenmanMonteithTraits, SkyTable, percent_per_degree,
    reference_evaporation_mm,
};

const LATITUDE_DEG: f64 = 47.45;

fn rows(text: &str) -> Vec<csv::StringRecord> {
    csv::Reader::from_reader(text.as_bytes()).records().map(|row| row.expect("a row")).collect()
}

fn number(row: &csv::StringRecord, column: usize) -> f64 {
    row[column].parse().expect("a number")
}

fn penman_monteith() -> Method {
    Method::PenmanMonteith(PenmanMonteithTraits::new(100.0, INTERIOR_SOLAR_RANGE_COEFFICIENT))
}

fn sky() -> SkyTable {
    SkyTable::at_latitude(LATITUDE_DEG).expect("a latitude")
}

/// The whole record, numbered by day of year.
fn record() -> Vec<(u16, EvaporationDay)> {
    let mut day_of_year = 0;
    let number_days = |row: csv::StringRecord| {
        day_of_year = if row[0].ends_with("-01-01") { 1 } else { day_of_year + 1 };
        (day_of_year, EvaporationDay::from_extremes(number(&row, 3), number(&row, 2)))
    };
    rows(include_str!("station/seattle-weather.csv")).into_iter().map(number_days).collect()
}

#[test]
fn an_independent_library_agrees() {
    let sky = sky();
    let library = rows(include_str!("station/library_values.csv"));
    assert_eq!(library.len(), 49);
    let mut worst: f64 = 0.0;
    for row in &library {
        let day_of_year = number(row, 1) as u16;
        let mut day = EvaporationDay::from_extremes(number(row, 2), number(row, 3));
        day.wind_2m_ms = number(row, 4);
        let ours = |method| reference_evaporation_mm(&method, &sky, day_of_year, &day, 0.0);
        // The library's latent heat varies with temperature (FAO-56 annex 3, eq. 3-1); ours is fixed.
        let latent_heat = 2.501 - 0.002_361 * (day.tmin_c + day.tmax_c) / 2.0;
        for (value, theirs) in [
            (ours(Method::HargreavesSamani) / MM_PER_MJ_M2 / latent_heat, number(row, 5)),
            (ours(Method::Oudin) * LATENT_HEAT_OF_VAPORISATION_MJ_KG / latent_heat, number(row, 6)),
            (ours(penman_monteith()), number(row, 7)),
        ] {
            assert!(theirs > 0.0, "{}", &row[0]);
            worst = worst.max((value / theirs - 1.0).abs());
        }
    }
    println!("largest relative difference: {worst:.1e}");
    // The library writes π with nine decimals, which alone is 1.3e-10.
    assert!(worst < 1e-9, "{worst:e}");
}

#[test]
fn every_day_of_the_record_evaporates_something_plausible() {
    let (sky, record) = (sky(), record());
    assert_eq!(record.len(), 1461);
    assert_eq!(record.iter().filter(|(day_of_year, _)| *day_of_year == 366).count(), 1);
    for method in [penman_monteith(), Method::HargreavesSamani, Method::Oudin] {
        let daily = record.iter().map(|(on, day)| reference_evaporation_mm(&method, &sky, *on, day, 0.0));
        let yearly_mm = daily.inspect(|mm| assert!((0.0..10.0).contains(mm), "{mm}")).sum::<f64>() / 4.0;
        let percent = percent_per_degree(&method, &sky, record.iter().copied()).expect("a record");
        println!("{method:?}: {yearly_mm:.0} mm a year, {percent:.2} % per degree");
        assert!((500.0..1000.0).contains(&yearly_mm), "{yearly_mm}");
        assert!((1.0..8.0).contains(&percent), "{percent}");
    }
}

#[test]
fn one_degree_adds_to_hargreaves_samani_what_its_formula_says() {
    // Each day grows by 1 / (mean + 17.8); weighted by the days' evaporation that is the whole record's percentage.
    let (sky, record) = (sky(), record());
    let (mut added_mm, mut sum_mm) = (0.0, 0.0);
    for (on, day) in &record {
        let mm = reference_evaporation_mm(&Method::HargreavesSamani, &sky, *on, day, 0.0);
        sum_mm += mm;
        added_mm += mm / ((day.tmin_c + day.tmax_c) / 2.0 + 17.8);
    }
    let percent = percent_per_degree(&Method::HargreavesSamani, &sky, record.iter().copied()).expect("a record");
    assert!((percent - 100.0 * added_mm / sum_mm).abs() < 1e-9);
}

#[test]
fn humidity_from_the_coldest_hour_is_the_missing_data_rule() {
    let sky = sky();
    for (on, day) in record() {
        let with_humidity = EvaporationDay { vapour_pressure_kpa: saturation_vapour_pressure_kpa(day.tmin_c), ..day };
        let with_wind = EvaporationDay { wind_2m_ms: 2.0, ..with_humidity };
        let at = |day: &EvaporationDay| reference_evaporation_mm(&penman_monteith(), &sky, on, day, 1.5);
        assert_eq!(at(&day), at(&with_wind));
    }
}
