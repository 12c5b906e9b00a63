//! Invented valleys and weather for tests and benchmarks: plain values, no files.
#![allow(dead_code, reason = "each test takes what it needs")]

use chrono::NaiveDate;
use deshielo::water::calendar::{CalendarDay, MonthDay, fill_calendar};
use deshielo::water::canals::{MinimumPlace, PriorityDate, SharingRule};
use deshielo::water::evaporation::{EvaporationDay, Method};
use deshielo::water::valley::*;
use deshielo::water::weather::StationDay;

/// 1 March and the like.
pub fn on(month: u8, day: u8) -> MonthDay {
    MonthDay::new(month, day).unwrap()
}

/// A northern basin of `bands` bands from 2200 to 3700 m, with nothing below the dam.
pub fn bare_basin(bands: usize) -> Valley {
    let step_m = 1500.0 / bands as f64;
    Valley {
        latitude_deg: 40.0,
        water_year_start_month: 10,
        station_elevation_m: 2300.0,
        climb: Climb {
            lapse_c_per_km: [-6.5; 12],
            precipitation_per_100m: 0.05,
            precipitation_factor: 1.0,
            snow_catch_factor: 1.1,
            warming_weight: [1.0; 4],
        },
        rain_snow: RainSnow { all_snow_below_c: -0.5, all_rain_above_c: 2.5, wet_bulb: false },
        snow: SnowTraits {
            melt_above_c: 0.0,
            melt_factor_mm_c_day: 3.5,
            melt_swing_mm_c_day: 1.5,
            refreeze_share: 0.05,
            liquid_holding_share: 0.1,
            heat_of_rain: true,
            full_cover_mm: 40.0,
            sublimation_mm_day: 0.0,
        },
        evaporation: EvaporationTraits {
            method: Method::HargreavesSamani,
            reference_elevation_m: 2300.0,
            lake_factor: 1.05,
        },
        soil: SoilTraits { capacity_mm: 150.0, recharge_power: 2.5, dry_share: 0.7 },
        ground: GroundTraits { quick_days: 5.0, slow_days: 60.0, percolation_mm_day: 1.2 },
        channel: ChannelTraits { unit_hydrograph_base_days: 2.5, reach: None },
        bands: (0..bands)
            .map(|index| Band {
                area_km2: 20.0 + index as f64,
                elevation_m: 2200.0 + step_m * (index as f64 + 0.5),
                melt_exposure: 1.0,
                evaporation_factor: 1.0 - 0.02 * index as f64,
            })
            .collect(),
        reservoir: None,
        gates: heapless::Vec::new(),
        minimum: RiverMinimum {
            at: MinimumPlace::RiverEnd,
            right_date: PriorityDate::BeforeAll,
            rate_m3s: heapless::Vec::new(),
        },
        rule: SharingRule::Seniority,
        start: Start {
            snow_mm: 0.0,
            soil_share: 0.5,
            quick_mm: 5.0,
            slow_mm: 40.0,
            storage_share: 0.5,
            settling_years: 0,
        },
        enough_share: 0.9,
        survey: on(4, 1),
        spring_months: (4, 7),
    }
}

/// Numbers between 0 and 1 (linear congruential, Numerical Recipes constants).
pub fn numbers(seed: u32) -> impl FnMut() -> f64 {
    let mut state = seed;
    move || {
        state = state.wrapping_mul(1_664_525).wrapping_add(1_013_904_223);
        f64::from(state) / 4_294_967_296.0
    }
}

/// `years` water years of invented weather from 1 October 1980.
pub fn record(valley: &Valley, years: i32, seed: u32) -> (Vec<CalendarDay>, Vec<StationDay>) {
    let start_month = u32::from(valley.water_year_start_month);
    let start = NaiveDate::from_ymd_opt(1980, start_month, 1).unwrap();
    let end = NaiveDate::from_ymd_opt(1980 + years, start_month, 1).unwrap();
    let days = (end - start).num_days() as usize;
    let blank = CalendarDay { water_year: 0, day_of_year: 1, day_of_water_year: 1, month_day: on(1, 1) };
    let mut calendar = vec![blank; days];
    fill_calendar(start, valley.water_year_start_month, &mut calendar);
    let mut next = numbers(seed);
    let (mut wet, mut drift) = (false, 0.0);
    let coldest_day = if valley.is_southern() { 197.0 } else { 15.0 };
    let record = calendar
        .iter()
        .map(|day| {
            let angle = 2.0 * std::f64::consts::PI * (f64::from(day.day_of_year) - coldest_day) / 365.0;
            let season = 0.5 + 0.5 * libm::cos(angle);
            wet = next() < if wet { 0.62 } else { 0.18 + 0.14 * season };
            let depth = -libm::log(1.0 - next()) * (4.0 + 3.0 * season);
            drift = 0.75 * drift + 4.0 * (next() + next() + next() - 1.5);
            let mean = 6.0 - 11.0 * libm::cos(angle) + drift;
            let range = 8.0 + 6.0 * next();
            let air = EvaporationDay::from_extremes(mean - range / 2.0, mean + range / 2.0);
            StationDay::at_station(valley, day.month_index(), if wet { depth } else { 0.0 }, air)
        })
        .collect();
    (calendar, record)
}
