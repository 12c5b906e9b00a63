//! The days of two runs as a NetCDF file after the CF conventions 1.11: units, standard names, calendar and bounds.

use chrono::NaiveDate;

use super::netcdf::{Attribute, File, Values, Variable};

/// What stands for a value that does not exist: the default of the format for doubles.
const FILL: f64 = 9.969_209_968_386_869e36;
/// Days are counted from here.
const SINCE: &str = "days since 1900-01-01 00:00:00";

/// What a number of every day is.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct About {
    /// Its unit as UDUNITS writes it.
    pub unit: &'static str,
    /// Its CF standard name, where there is one.
    pub standard_name: Option<&'static str>,
    /// How it stands for its day.
    pub cell_methods: &'static str,
}

/// One number of every day in both runs.
#[derive(Clone, Debug, PartialEq)]
pub struct Series {
    /// Its name, with the unit.
    pub key: String,
    /// What it is, in English and in Spanish.
    pub meaning: [String; 2],
    /// Day by day: as it was, with the changes.
    pub runs: [Vec<f64>; 2],
}

/// A canal or town.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Canal {
    /// Its key.
    pub key: String,
    /// Its name.
    pub name: String,
}

/// One number of every day and canal in both runs.
#[derive(Clone, Debug, PartialEq)]
pub struct CanalSeries {
    /// Name, with the unit.
    pub key: String,
    /// What it is, in English and in Spanish.
    pub meaning: [String; 2],
    /// For each canal the days of both runs.
    pub canals: Vec<[Vec<f64>; 2]>,
}

/// All days of two runs.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct RunDays {
    /// What the file is called.
    pub title: String,
    /// What it was made with.
    pub source: String,
    /// How it came to be.
    pub history: String,
    /// What must be said with it.
    pub comment: String,
    /// The days, rising.
    pub dates: Vec<NaiveDate>,
    /// Water year of each day.
    pub water_years: Vec<i32>,
    /// Canals and towns in downstream order.
    pub canals: Vec<Canal>,
    /// Numbers of the valley.
    pub valley: Vec<Series>,
    /// Numbers of every canal.
    pub of_canals: Vec<CanalSeries>,
}

/// What the column of this name is; by its ending where it has no entry of its own.
pub fn about(key: &str) -> About {
    let mean = |unit, standard_name| About { unit, standard_name, cell_methods: "time: mean" };
    let sum = |unit, standard_name| About { unit, standard_name, cell_methods: "time: sum" };
    // A store is told as it stands in the evening, at the end of its day.
    let evening = |unit, standard_name| About { unit, standard_name, cell_methods: "time: point" };
    match key {
        "precipitation_mm" => sum("mm", Some("lwe_thickness_of_precipitation_amount")),
        "snowfall_mm" => sum("mm", Some("lwe_thickness_of_snowfall_amount")),
        "snow_water_mm" => evening("mm", Some("lwe_thickness_of_surface_snow_amount")),
        "soil_mm" | "ground_mm" | "channel_mm" => evening("mm", None),
        "evaporation_mm" => sum("mm", Some("lwe_thickness_of_water_evaporation_amount")),
        "sublimation_mm" | "reference_evaporation_mm" => sum("mm", None),
        "inflow_m3s" | "river_out_m3s" => mean("m3 s-1", Some("water_volume_transport_in_river_channel")),
        "storage_hm3" | "account_hm3" => evening("hm3", None),
        "lake_level_m" => evening("m", None),
        "lake_area_km2" => evening("km2", None),
        "river_minimum_met" => mean("1", None),
        key if key.ends_with("_m3s") => mean("m3 s-1", None),
        key if key.ends_with("_m3") => sum("m3", None),
        key if key.ends_with("_mm") => sum("mm", None),
        _ => mean("1", None),
    }
}

/// The file. Dimensions: run, canal, time; a variable a column, named as `tell` names it, a canal's with `canal_` before.
pub fn run_file(days: &RunDays) -> File {
    let runs = ["as_it_was", "with_changes"];
    let names: Vec<&[u8]> = runs.iter().map(|run| run.as_bytes()).collect();
    let run_width = names.iter().map(|name| name.len()).max().unwrap_or(1);
    let canal_names: Vec<&[u8]> = days.canals.iter().map(|canal| canal.name.as_bytes()).collect();
    let canal_keys: Vec<&[u8]> = days.canals.iter().map(|canal| canal.key.as_bytes()).collect();
    let width_of = |names: &[&[u8]]| names.iter().map(|name| name.len()).max().unwrap_or(0).max(1);
    let name_width = width_of(&canal_names).max(width_of(&canal_keys));
    let mut file = File {
        dimensions: vec![
            ("run".to_owned(), runs.len()),
            ("time".to_owned(), days.dates.len()),
            ("bounds".to_owned(), 2),
            ("run_letters".to_owned(), run_width),
        ],
        attributes: vec![
            Attribute::text("Conventions", "CF-1.11"),
            Attribute::text("title", &days.title),
            Attribute::text("source", &days.source),
            Attribute::text("history", &days.history),
            Attribute::text("comment", &days.comment),
        ],
        variables: Vec::new(),
    };
    let (run, time, bounds, run_letters) = (0, 1, 2, 3);
    let has_canals = !days.canals.is_empty();
    let (canal, canal_letters) = (4, 5);
    if has_canals {
        file.dimensions.push(("canal".to_owned(), days.canals.len()));
        file.dimensions.push(("canal_letters".to_owned(), name_width));
    }
    let epoch = NaiveDate::from_ymd_opt(1900, 1, 1).unwrap_or_default();
    let starts: Vec<f64> = days.dates.iter().map(|date| (*date - epoch).num_days() as f64).collect();
    let mut add = |name: &str, dimensions: &[usize], attributes: Vec<Attribute>, values: Values| {
        file.variables.push(Variable { name: name.to_owned(), dimensions: dimensions.to_vec(), attributes, values });
    };
    add(
        "time",
        &[time],
        vec![
            Attribute::text("standard_name", "time"),
            Attribute::text("long_name", "middle of the day"),
            Attribute::text("units", SINCE),
            Attribute::text("calendar", "standard"),
            Attribute::text("units_metadata", "leap_seconds: none"),
            Attribute::text("axis", "T"),
            Attribute::text("bounds", "time_bounds"),
        ],
        Values::Double(starts.iter().map(|start| start + 0.5).collect()),
    );
    let both = starts.iter().flat_map(|start| [*start, start + 1.0]).collect();
    add("time_bounds", &[time, bounds], vec![], Values::Double(both));
    let label = |long: &str| vec![Attribute::text("long_name", long)];
    add("run_name", &[run, run_letters], label("name of the run"), Values::Text(rows(&names, run_width)));
    if has_canals {
        let keys = rows(&canal_keys, name_width);
        add("canal_key", &[canal, canal_letters], label("key of the canal or town"), Values::Text(keys));
        let names = rows(&canal_names, name_width);
        add("canal_name", &[canal, canal_letters], label("name of the canal or town"), Values::Text(names));
    }
    let year = vec![Attribute::text("long_name", "water year"), Attribute::text("units", "1")];
    add("water_year", &[time], year, Values::Whole(days.water_years.clone()));
    for series in &days.valley {
        let values = series.runs.iter().flatten().map(filled).collect();
        let told = described(&series.key, &series.meaning, "run_name water_year");
        add(&series.key, &[run, time], told, Values::Double(values));
    }
    for record in days.of_canals.iter().filter(|_| has_canals) {
        let values = record.canals.iter().flatten().flatten().map(filled).collect();
        let told = described(&record.key, &record.meaning, "canal_name run_name water_year");
        add(&format!("canal_{}", record.key), &[canal, run, time], told, Values::Double(values));
    }
    file
}

fn described(key: &str, meaning: &[String; 2], coordinates: &str) -> Vec<Attribute> {
    let about = about(key);
    let mut told = vec![Attribute::text("long_name", meaning[0].trim_end_matches('.'))];
    told.push(Attribute::text("long_name_es", meaning[1].trim_end_matches('.')));
    told.extend(about.standard_name.map(|name| Attribute::text("standard_name", name)));
    told.push(Attribute::text("units", about.unit));
    told.push(Attribute::text("cell_methods", about.cell_methods));
    told.push(Attribute::text("coordinates", coordinates));
    told.push(Attribute::double("_FillValue", FILL));
    told
}

fn filled(value: &f64) -> f64 {
    if value.is_finite() { *value } else { FILL }
}

/// Names as rows of one width; what is left of a row is empty.
fn rows(names: &[&[u8]], width: usize) -> Vec<u8> {
    let mut rows = Vec::with_capacity(names.len() * width);
    for name in names {
        rows.extend(name.iter().copied().chain(std::iter::repeat(0)).take(width));
    }
    rows
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_variable_fits_its_dimensions() {
        let series = Series {
            key: "inflow_m3s".into(),
            meaning: ["River.".into(), "Río.".into()],
            runs: [vec![1.0, f64::NAN], vec![2.0, 3.0]],
        };
        let days = RunDays {
            dates: vec![NaiveDate::from_ymd_opt(1900, 1, 1).unwrap(), NaiveDate::from_ymd_opt(1900, 1, 2).unwrap()],
            water_years: vec![1900, 1900],
            canals: vec![Canal { key: "a".into(), name: "Álamo".into() }],
            valley: vec![series],
            of_canals: vec![CanalSeries {
                key: "demand_m3s".into(),
                meaning: ["Asked.".into(), "Pedida.".into()],
                canals: vec![[vec![1.0, 2.0], vec![3.0, 4.0]]],
            }],
            ..RunDays::default()
        };
        let file = run_file(&days);
        assert!(file.bytes().is_ok());
        let flow = file.variables.iter().find(|variable| variable.name == "inflow_m3s").unwrap();
        assert_eq!(flow.values, Values::Double(vec![1.0, FILL, 2.0, 3.0]));
        let time = &file.variables[0];
        assert_eq!(time.values, Values::Double(vec![0.5, 1.5]));
        // A letter of two bytes counts twice.
        assert_eq!(file.dimensions[5], ("canal_letters".to_owned(), 6));
    }
}
