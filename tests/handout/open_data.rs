//! Open data against `tell`: the same numbers to the last bit.

use super::command::Desk;
use super::net_cdf::read;

const RUN: &str = "demo --set warming=2 --years 1988..1990";

/// The rows of a table, by column.
fn table(text: &str) -> Vec<std::collections::BTreeMap<String, String>> {
    let mut reader = csv::Reader::from_reader(text.as_bytes());
    let heads: Vec<String> = reader.headers().unwrap().iter().map(str::to_owned).collect();
    let rows = reader.records().map(|row| heads.iter().cloned().zip(row.unwrap().iter().map(str::to_owned)).collect());
    rows.collect()
}

#[test]
fn the_tables_are_those_of_tell() {
    let desk = Desk::new();
    let (code, daily, _) = desk.run(&format!("tell {RUN} --daily --form csv --lang en"));
    assert_eq!(code, 0);
    let (_, yearly, _) = desk.run(&format!("tell {RUN} --form csv --lang en"));
    desk.write(&format!("data {RUN} --into open --lang en"), "open/dictionary.csv");
    let read = |name: &str| std::fs::read_to_string(desk.path("open").join(name)).unwrap();
    assert_eq!(read("years.csv"), yearly);
    let (told, days, canals) = (table(&daily), table(&read("days.csv")), table(&read("canals.csv")));
    assert_eq!(told.len(), days.len());
    assert!(days.len() > 2 * 3 * 365);
    for (told, day) in told.iter().zip(&days) {
        assert!(day.iter().all(|(column, value)| told[column] == *value), "{day:?}");
    }
    let gates = canals.len() / days.len();
    assert!(gates > 3 && canals.len() == gates * days.len());
    for (told, row) in
        told.iter().zip(canals.chunks_exact(gates)).flat_map(|(told, rows)| rows.iter().map(move |row| (told, row)))
    {
        for (column, value) in row.iter().filter(|(column, _)| column.contains("_m3") || column.contains("_hm3")) {
            assert_eq!(&told[&format!("{}_{column}", row["canal"])], value);
        }
    }
    // Every column of every table is in the dictionary, in both languages.
    let dictionary = table(&read("dictionary.csv"));
    for (file, rows) in [("days.csv", &days), ("canals.csv", &canals), ("years.csv", &table(&yearly))] {
        for column in rows[0].keys() {
            let entry = dictionary.iter().find(|entry| entry["file"] == file && entry["column"] == *column);
            let entry = entry.unwrap_or_else(|| panic!("{file}: {column} is not told of"));
            assert!(entry["meaning_en"].len() > 5 && entry["meaning_es"].len() > 5, "{entry:?}");
            assert_ne!(entry["meaning_en"], entry["meaning_es"]);
        }
    }
}

#[test]
fn the_file_holds_the_numbers_of_tell() {
    let desk = Desk::new();
    let (_, daily, _) = desk.run(&format!("tell {RUN} --daily --form csv --lang en"));
    let told = table(&daily);
    let file = read(&desk.write(&format!("data {RUN} --form netcdf --out run.nc --lang en"), "run.nc"));
    assert_eq!(file.attributes["Conventions"], "CF-1.11");
    assert!(file.attributes["history"].ends_with("deshielo data demo --set warming=2 --years 1988..1990"));
    let days = told.len() / 2;
    let length = |name: &str| file.dimensions.iter().find(|(known, _)| known == name).unwrap().1;
    assert_eq!((length("time"), length("run")), (days, 2));
    let (mut seen, fill) = (0, 9.969_209_968_386_869e36);
    for (name, variable) in
        file.variables.iter().filter(|(_, variable)| variable.attributes.contains_key("cell_methods"))
    {
        for attribute in ["units", "long_name", "long_name_es", "coordinates"] {
            assert!(variable.attributes.contains_key(attribute), "{name}: {attribute}");
        }
        let written = |text: &str| if text.is_empty() { fill } else { text.parse::<f64>().unwrap() };
        let keys = &file.variables["canal_key"];
        let width = length("canal_letters");
        let columns: Vec<String> = match name.strip_prefix("canal_") {
            None => vec![name.clone()],
            Some(column) => keys
                .text
                .chunks_exact(width)
                .map(|key| format!("{}_{column}", String::from_utf8_lossy(key).trim_end_matches('\0')))
                .collect(),
        };
        let wanted: Vec<f64> = columns.iter().flat_map(|column| told.iter().map(|row| written(&row[column]))).collect();
        assert!(variable.doubles.iter().zip(&wanted).all(|(got, want)| got.to_bits() == want.to_bits()), "{name}");
        assert_eq!(variable.doubles.len(), wanted.len());
        seen += columns.len();
    }
    assert_eq!(seen, told[0].len() - 3, "every column but run, date and water year");
    // The first of October 1987 at noon, counted from the first of January 1900.
    let time = &file.variables["time"];
    assert_eq!(time.doubles[0], 32_049.5);
    assert_eq!(time.attributes["units"], "days since 1900-01-01 00:00:00");
}
