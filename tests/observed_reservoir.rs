//! Fifty years of an operator's reservoir record replayed in acre-feet and ft³/s, where the record is present; else
//! skipped. It proves units and arithmetic, not hydrology: the operator worked the inflow out from the storage.
//!
//! This is a path of the test alone: evaporation is off, and slightly negative inflows are let through. The operator's
//! inflow is what came in before the lake lost water to the air, so a balance without evaporation drifts away from the
//! record, some 600 acre-feet a year and always to the same side. It is therefore held within 1 % of capacity from each
//! evening to the next over all the years, and, with one mean loss a month learnt from odd water years, over whole water
//! years that start from the record once a year.

use std::path::Path;

use deshielo::water::calendar::CalendarDay;
use deshielo::water::units::{M3_PER_ACRE_FOOT, M3S_PER_FT3S, m3_per_day};

struct Day {
    calendar: CalendarDay,
    storage_acre_feet: f64,
    inflow_ft3s: f64,
    release_ft3s: f64,
}

impl Day {
    /// Inflow less release, acre-feet a day.
    fn net_acre_feet(&self) -> f64 {
        m3_per_day((self.inflow_ft3s - self.release_ft3s) * M3S_PER_FT3S) / M3_PER_ACRE_FOOT
    }
}

fn record() -> Option<Vec<Day>> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("../shared/observed/reservoir_daily.csv");
    let mut reader = csv::Reader::from_path(path).ok()?;
    let columns = ["date", "storage_acre_feet", "inflow_cfs", "release_cfs"];
    assert_eq!(reader.headers().unwrap().iter().collect::<Vec<_>>(), columns);
    let days = reader.records().map(|row| {
        let row = row.unwrap();
        Day {
            calendar: CalendarDay::new(row[0].parse().unwrap(), 10),
            storage_acre_feet: row[1].parse().unwrap(),
            inflow_ft3s: row[2].parse().unwrap(),
            release_ft3s: row[3].parse().unwrap(),
        }
    });
    Some(days.collect())
}

/// The largest storage on record stands for capacity.
fn capacity_acre_feet(record: &[Day]) -> f64 {
    record.iter().map(|day| day.storage_acre_feet).fold(0.0, f64::max)
}

/// What each evening's storage has more than the balance from the evening before would give, acre-feet.
fn unexplained(record: &[Day]) -> Vec<f64> {
    let pairs = record.windows(2);
    pairs.map(|p| p[1].storage_acre_feet - p[0].storage_acre_feet - p[1].net_acre_feet()).collect()
}

#[test]
fn the_balance_replays_storage_from_evening_to_evening() {
    let Some(record) = record() else {
        println!("skipped: no observed record");
        return;
    };
    assert_eq!((record.len(), record.iter().filter(|day| day.inflow_ft3s < 0.0).count()), (19_731, 14));
    let capacity = capacity_acre_feet(&record);
    let off = unexplained(&record);
    let worst = off.iter().fold(0.0, |worst: f64, off| worst.max(off.abs())) / capacity;
    let drift = off.iter().sum::<f64>() / capacity;
    println!("capacity {capacity} acre-feet; worst day {:.3} %", 100.0 * worst);
    println!("without a new start the balance ends {:.1} % of capacity away: the lake's evaporation", -100.0 * drift);
    assert!(worst <= 0.01, "a day is off by {worst} of capacity");
    // The drift is a loss that the operator had counted in, not an error of units: it has one sign.
    let gains = off.iter().filter(|off| **off > 0.1).count();
    assert!(gains * 1000 < off.len(), "{gains} days gain water that the balance does not know");
}

#[test]
fn the_factor_between_the_records_units_is_ours() {
    let Some(record) = record() else {
        println!("skipped: no observed record");
        return;
    };
    // Slope of the change of storage (acre-feet) over inflow less release (acre-feet by our constants): one.
    let change: Vec<f64> = record.windows(2).map(|p| p[1].storage_acre_feet - p[0].storage_acre_feet).collect();
    let net: Vec<f64> = record[1..].iter().map(Day::net_acre_feet).collect();
    let mean = |values: &[f64]| values.iter().sum::<f64>() / values.len() as f64;
    let (mean_change, mean_net) = (mean(&change), mean(&net));
    let together: f64 = change.iter().zip(&net).map(|(c, n)| (c - mean_change) * (n - mean_net)).sum();
    let alone: f64 = net.iter().map(|n| (n - mean_net) * (n - mean_net)).sum();
    let slope = together / alone;
    println!("slope {slope}");
    assert!((slope - 1.0).abs() < 5e-4, "slope {slope}");
}

#[test]
fn with_a_mean_loss_for_each_month_whole_water_years_are_replayed() {
    let Some(record) = record() else {
        println!("skipped: no observed record");
        return;
    };
    let capacity = capacity_acre_feet(&record);
    let (mut sum, mut days) = ([0.0; 12], [0.0; 12]);
    for (day, off) in record[1..].iter().zip(unexplained(&record)) {
        // A few days of the record jump by hundreds of acre-feet; they are no evaporation.
        if day.calendar.water_year % 2 == 1 && off.abs() < 20.0 {
            sum[day.calendar.month_index()] += off;
            days[day.calendar.month_index()] += 1.0;
        }
    }
    let (mut storage, mut worst, mut years) = (f64::NAN, 0.0_f64, 0);
    for pair in record.windows(2) {
        let today = &pair[1];
        if today.calendar.day_of_water_year == 1 {
            storage = pair[0].storage_acre_feet;
            years += 1;
        }
        let month = today.calendar.month_index();
        storage += today.net_acre_feet() + sum[month] / days[month];
        if !storage.is_nan() {
            worst = worst.max((storage - today.storage_acre_feet).abs() / capacity);
        }
    }
    println!("{years} water years, worst evening {:.3} % of capacity", 100.0 * worst);
    assert_eq!(years, 54);
    assert!(worst <= 0.01, "an evening is off by {worst} of capacity");
}

/// Numbers in the code of a file, its own tests left out, with the line of each.
fn literals(text: &str) -> Vec<(usize, f64)> {
    let code = text.split("#[cfg(test)]").next().unwrap_or(text);
    let mut found = Vec::new();
    for (line, code) in code.lines().enumerate() {
        let code = code.split("//").next().unwrap_or(code).replace('_', "");
        let words = code.split(|c: char| !(c.is_ascii_alphanumeric() || c == '.'));
        found.extend(words.filter_map(|word| word.parse::<f64>().ok()).map(|number| (line + 1, number)));
    }
    found
}

#[test]
fn no_unit_constant_is_typed_twice() {
    use deshielo::water::units::*;
    let names = [SECONDS_PER_DAY, M_PER_FOOT, MM_PER_INCH, SQUARE_FEET_PER_ACRE, M2_PER_ACRE, M3_PER_ACRE_FOOT];
    let more = [M3S_PER_FT3S, KM_PER_MILE, MS_PER_MPH, M2_PER_SQUARE_MILE, m3_per_day(M3S_PER_FT3S)];
    // Acre-feet in a day of one cubic foot per second, and millimetres in a foot.
    let made = [m3_per_day(M3S_PER_FT3S) / M3_PER_ACRE_FOOT, 12.0 * MM_PER_INCH];
    let constants: Vec<f64> = names.into_iter().chain(more).chain(made).collect();
    let (mut files, mut seen_in_units) = (0, 0);
    let mut folders = vec![Path::new(env!("CARGO_MANIFEST_DIR")).join("src")];
    while let Some(folder) = folders.pop() {
        for entry in std::fs::read_dir(folder).unwrap() {
            let path = entry.unwrap().path();
            if path.is_dir() {
                folders.push(path);
                continue;
            }
            if path.extension().is_none_or(|extension| extension != "rs") {
                continue;
            }
            files += 1;
            for (line, number) in literals(&std::fs::read_to_string(&path).unwrap()) {
                // Within the digits that people write: 0.0283, 1233.5, 0.405.
                let same = |constant: &f64| {
                    let off = |one: f64| (number - one).abs() <= 5e-5 * one;
                    off(*constant) || off(1.0 / constant)
                };
                if !constants.iter().any(same) {
                    continue;
                }
                assert!(path.ends_with("water/units.rs"), "{}:{line}: {number} is a unit", path.display());
                seen_in_units += 1;
            }
        }
    }
    assert!(files > 50, "only {files} files were read");
    assert_eq!(seen_in_units, 4, "seconds in a day, metres in a foot, millimetres in an inch, square feet in an acre");
}
