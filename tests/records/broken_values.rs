//! Records whose numbers can be read but cannot be right.

use chrono::{Days, NaiveDate};
use deshielo::place::record::{ColumnPlan, DateOrder, DatePlan, Measure, MeasureUnit, RecordPlan};

use crate::broken::{Broken, broken};

/// A record of `days` from 1 January 2001 on, one column for each of `columns`; `row` gives the day's values.
fn record(columns: &[(Measure, MeasureUnit)], days: u64, row: impl Fn(u64) -> Vec<f64>) -> (RecordPlan, String) {
    let names = ["a", "b", "c", "d"];
    let plans = columns.iter().zip(names).map(|((measure, unit), name)| ColumnPlan::new(name, *measure, *unit));
    let date = DatePlan::Column { name: "date".into(), order: DateOrder::YearMonthDay };
    let plan = RecordPlan::new("days.csv", date, plans.collect());
    let first = NaiveDate::from_ymd_opt(2001, 1, 1).unwrap();
    let mut text = format!("date,{}\n", names[..columns.len()].join(","));
    for day in 0..days {
        // NaN stands for a cell left empty.
        let cells = row(day).into_iter().map(|value| if value.is_nan() { String::new() } else { value.to_string() });
        let cells: Vec<String> = cells.collect();
        text.push_str(&format!("{},{}\n", first + Days::new(day), cells.join(",")));
    }
    (plan, text)
}

/// −1 in midwinter, 1 in midsummer: a year in whole numbers, good enough for doubts.
fn season(day: u64) -> f64 {
    1.0 - ((day % 365) as f64 - 182.0).abs() / 91.0
}

fn case(
    name: &'static str,
    columns: &[(Measure, MeasureUnit)],
    days: u64,
    row: impl Fn(u64) -> Vec<f64>,
    expected: &[(&'static str, usize, usize)],
) -> Broken {
    let (plan, text) = record(columns, days, row);
    broken(name, plan, text, expected)
}

pub fn all() -> Vec<Broken> {
    [temperatures(), rain_and_snow(), air(), river()].into_iter().flatten().collect()
}

fn temperatures() -> Vec<Broken> {
    use Measure::{DewPoint, TemperatureMax as Tmax, TemperatureMean as Tmean, TemperatureMin as Tmin};
    use MeasureUnit::{Celsius as C, Fahrenheit as F};
    vec![
        case(
            "°F given as °C",
            &[(Tmin, C), (Tmax, C)],
            365,
            |day| vec![(28.0 + 22.0 * season(day)).round(), (52.0 + 25.0 * season(day)).round()],
            // Where rounding first reaches the 50 °F and the 77 °F of midsummer.
            &[("problem-record-fahrenheit", 182, 12), ("problem-record-fahrenheit", 183, 15)],
        ),
        case(
            "a day too wide for °C",
            &[(Tmin, C), (Tmax, C)],
            365,
            |day| vec![10.0 + 5.0 * season(day), 35.0 + 10.0 * season(day)],
            &[("problem-record-range-wide", 2, 12)],
        ),
        case(
            "°C given as °F",
            &[(Tmax, F)],
            365,
            |day| vec![12.0 + 14.0 * season(day)],
            &[("problem-record-celsius", 184, 12)],
        ),
        case(
            "coldest over warmest on two days",
            &[(Tmin, C), (Tmax, C)],
            20,
            |day| if day == 4 || day == 9 { vec![9.0, -1.0] } else { vec![day as f64, 20.0 + day as f64] },
            &[("problem-record-coldest-over-warmest", 6, 12)],
        ),
        case(
            "columns swapped",
            &[(Tmin, C), (Tmax, C)],
            20,
            |day| vec![20.0 + day as f64, day as f64],
            &[("problem-record-temperatures-swapped", 2, 12)],
        ),
        case(
            "a mean outside its day",
            &[(Tmin, C), (Tmax, C), (Tmean, C)],
            5,
            |day| vec![0.0, 10.0 + day as f64, if day == 2 { 14.0 } else { 5.0 }],
            &[("problem-record-mean-outside", 4, 17)],
        ),
        case(
            "dew over the warmest",
            &[(Tmax, C), (DewPoint, C)],
            5,
            |day| vec![10.0, if day == 3 { 15.0 } else { 2.0 }],
            &[("problem-record-dew-over-warmest", 5, 15)],
        ),
        case(
            "a typing mistake",
            &[(Tmin, C)],
            400,
            |day| vec![if day == 100 { -123.0 } else { day as f64 % 9.0 }],
            &[("problem-record-out-of-bounds", 102, 12)],
        ),
        case(
            "two slips that would move any mean",
            &[(Tmin, C), (Tmax, C)],
            400,
            |day| vec![2.0 + day as f64 % 9.0, if day == 100 || day == 200 { 1e7 } else { 12.0 + day as f64 % 9.0 }],
            &[("problem-record-out-of-bounds", 102, 14)],
        ),
        case(
            "a filled warmest below a measured coldest",
            &[(Tmin, C), (Tmax, C)],
            5,
            |day| vec![if day == 2 { 12.0 } else { 0.0 }, if day == 2 { f64::NAN } else { 10.0 }],
            &[("problem-record-filled-across", 4, 15)],
        ),
        case(
            "a stuck sensor",
            &[(Tmean, C)],
            60,
            |day| vec![if (10..31).contains(&day) { 3.0 } else { day as f64 * 0.5 }],
            &[("problem-record-stuck", 12, 12)],
        ),
    ]
}

fn rain_and_snow() -> Vec<Broken> {
    use Measure::{Precipitation as P, ReferenceEvaporation, SnowWater};
    use MeasureUnit::{Inch, Millimetre as Mm};
    let wet = |day: u64| day.is_multiple_of(4);
    vec![
        case(
            "inches given as mm",
            &[(P, Mm)],
            365,
            |day| vec![if wet(day) { 0.05 * (day % 11) as f64 } else { 0.0 }],
            &[("problem-record-precipitation-inches", 34, 12)],
        ),
        case(
            "a desert",
            &[(P, Mm)],
            365,
            |day| vec![if day % 60 == 1 { 9.0 } else { 0.0 }],
            &[("problem-record-precipitation-little", 3, 12)],
        ),
        case(
            "mm given as inches",
            &[(P, Inch)],
            365,
            |day| vec![if wet(day) { 3.0 } else { 0.0 }],
            &[("problem-record-precipitation-much", 2, 12)],
        ),
        case(
            "a gauge that adds up, with a reset in autumn",
            &[(P, Mm)],
            365,
            |day| vec![((day + 91) % 365 / 4) as f64 * 3.0],
            &[("problem-record-precipitation-adds-up", 7, 12)],
        ),
        case(
            "rain below zero",
            &[(P, Mm)],
            10,
            |day| vec![if day > 7 { -0.2 } else { 1.0 }],
            &[("problem-record-precipitation-negative", 10, 12)],
        ),
        case(
            "too much rain for one day",
            &[(P, Mm)],
            10,
            |day| vec![if day == 6 { 2540.0 } else { 1.0 }],
            &[("problem-record-out-of-bounds", 8, 12)],
        ),
        case(
            "a gauge that stopped",
            &[(P, Mm)],
            730,
            |day| vec![if (200..420).contains(&day) || !wet(day) { 0.0 } else { 8.0 + (day % 5) as f64 }],
            // Day 196 was the last wet one before.
            &[("problem-record-precipitation-dry-run", 199, 12)],
        ),
        case(
            "snow below zero",
            &[(SnowWater, Mm)],
            10,
            |day| vec![if day == 1 { -3.0 } else { 100.0 }],
            &[("problem-record-snow-negative", 3, 12)],
        ),
        case(
            "evaporation in inches",
            &[(ReferenceEvaporation, Mm)],
            365,
            |day| vec![0.15 + 0.1 * season(day)],
            &[("problem-record-evaporation-little", 184, 12)],
        ),
    ]
}

fn air() -> Vec<Broken> {
    use Measure::{
        RelativeHumidityMax, RelativeHumidityMean, RelativeHumidityMin, Solar, Sunshine, VapourPressure, Wind,
    };
    use MeasureUnit::{Hectopascal, Hours, Kilopascal, MPerS, MjPerM2, Percent, Share, WattPerM2};
    vec![
        case(
            "shares given as percent",
            &[(RelativeHumidityMean, Percent)],
            40,
            |day| vec![0.5 + (day % 10) as f64 * 0.05],
            &[("problem-record-humidity-share", 11, 12)],
        ),
        case(
            "percent given as shares",
            &[(RelativeHumidityMean, Share)],
            40,
            |day| vec![50.0 + (day % 10) as f64],
            &[("problem-record-humidity-percent", 11, 12)],
        ),
        case(
            "humidity over 100 on two days",
            &[(RelativeHumidityMax, Percent)],
            20,
            |day| vec![if day > 17 { 104.0 } else { 90.0 }],
            &[("problem-record-out-of-bounds", 20, 12)],
        ),
        case(
            "lowest humidity over the highest",
            &[(RelativeHumidityMin, Percent), (RelativeHumidityMax, Percent)],
            5,
            |day| vec![if day == 2 { 95.0 } else { 30.0 }, 90.0],
            &[("problem-record-humidity-crossed", 4, 12)],
        ),
        case(
            "W/m² given as MJ/m²",
            &[(Solar, MjPerM2)],
            365,
            |day| vec![180.0 + 100.0 * season(day)],
            &[("problem-record-solar-watts", 184, 12)],
        ),
        case(
            "MJ/m² given as W/m²",
            &[(Solar, WattPerM2)],
            365,
            |day| vec![17.0 + 10.0 * season(day)],
            &[("problem-record-solar-megajoules", 184, 12)],
        ),
        case(
            "hPa given as kPa",
            &[(VapourPressure, Kilopascal)],
            40,
            |day| vec![6.0 + (day % 5) as f64],
            &[("problem-record-pressure-hectopascals", 6, 12)],
        ),
        case(
            "kPa given as hPa",
            &[(VapourPressure, Hectopascal)],
            365,
            |day| vec![0.6 + (day % 5) as f64 * 0.1],
            &[("problem-record-pressure-kilopascals", 6, 12)],
        ),
        case(
            "a storm every day",
            &[(Wind, MPerS)],
            40,
            |day| vec![15.0 + (day % 5) as f64],
            &[("problem-record-wind-strong", 2, 12)],
        ),
        case(
            "25 hours of sun",
            &[(Sunshine, Hours)],
            5,
            |day| vec![if day == 4 { 25.0 } else { 10.0 }],
            &[("problem-record-out-of-bounds", 6, 12)],
        ),
    ]
}

fn river() -> Vec<Broken> {
    use Measure::{ComputedInflow, Flow, Storage};
    use MeasureUnit::{AcreFeet, Ft3PerS};
    let one_below = |day: u64| vec![if day == 2 { -1.5 } else { 10.0 }];
    vec![
        case("flow below zero", &[(Flow, Ft3PerS)], 5, one_below, &[("problem-record-flow-negative", 4, 12)]),
        case(
            "inflow below zero",
            &[(ComputedInflow, Ft3PerS)],
            5,
            one_below,
            &[("problem-record-inflow-negative", 4, 12)],
        ),
        case("storage below zero", &[(Storage, AcreFeet)], 5, one_below, &[("problem-record-storage-negative", 4, 12)]),
    ]
}
