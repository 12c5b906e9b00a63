//! What every column of every table means: unit, and a plain sentence in English and in Spanish.

use crate::commands::speech::Speech;
use crate::commands::tell::yearly_columns;
use crate::open_data::{RunDays, about};
use crate::words::Words;

/// The dictionary as a table of its own.
pub(super) fn write(days: &RunDays, speech: &Speech) -> String {
    let languages = ["en", "es"].map(|language| speech.in_language(language));
    let say = |id: &str| [0, 1].map(|index: usize| languages[index].say(id, &[]));
    let mut writer = csv::WriterBuilder::new().from_writer(Vec::new());
    let mut row = |file: &str, column: &str, unit: &str, standard: &str, [en, es]: [String; 2]| {
        // Memory takes every row, and all rows are of one width.
        let _ = writer.write_record([file, column, unit, standard, &en, &es]);
    };
    row("file", "column", "unit", "cf_standard_name", ["meaning_en".to_owned(), "meaning_es".to_owned()]);
    let named = |key: &str| say(&Words::key_id("column", key));
    for (file, keys) in
        [("days.csv", &["run", "date", "water_year"][..]), ("canals.csv", &["run", "date", "water_year", "canal"])]
    {
        keys.iter().for_each(|key| row(file, key, "", "", named(key)));
        let series: Vec<(&String, &[String; 2])> = if file == "days.csv" {
            days.valley.iter().map(|series| (&series.key, &series.meaning)).collect()
        } else {
            days.of_canals.iter().map(|series| (&series.key, &series.meaning)).collect()
        };
        for (key, meaning) in series {
            let about = about(key);
            row(file, key, about.unit, about.standard_name.unwrap_or_default(), meaning.clone());
        }
    }
    for (column, id) in yearly_columns() {
        row("years.csv", &column, unit_of(&column), "", say(&id));
    }
    writer.into_inner().ok().and_then(|bytes| String::from_utf8(bytes).ok()).unwrap_or_default()
}

/// The unit of a yearly column, which its name ends in.
fn unit_of(column: &str) -> &'static str {
    const ENDS: [(&str, &str); 7] = [
        ("_hm3", "hm3"),
        ("_m3s", "m3 s-1"),
        ("_m3", "m3"),
        ("_mm", "mm"),
        ("_share", "1"),
        ("_ratio", "1"),
        ("_date", "date"),
    ];
    let days = ["days_full", "days_short", "days_cut", "river_minimum_days_met", "centre_of_volume_day"];
    if days.contains(&column) {
        return "day";
    }
    ENDS.iter().find(|(end, _)| column.ends_with(end)).map_or("", |(_, unit)| *unit)
}
