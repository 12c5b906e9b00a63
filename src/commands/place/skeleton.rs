//! The starter of a `place.toml`: what is known is written, what is not is asked for, and the rest is explained.

use super::ask::Answers;
use crate::place::preparing::{RecordKind, area_table, record_table, text_value};
use crate::place::record::Peek;
use crate::place::terrain::AreaCurve;
use crate::words::Words;

/// Letters of a line of explanation.
const LINE: usize = 96;

/// A record that goes into the new place.
pub(super) struct NewRecord {
    /// What it is for.
    pub kind: RecordKind,
    /// Its name in the place.
    pub file: String,
    /// What it seems to be.
    pub peek: Peek,
}

/// Everything that is known of the place.
pub(super) struct Known<'a> {
    /// What people answered.
    pub answers: &'a Answers,
    /// Records, each of another kind.
    pub records: &'a [NewRecord],
    /// The basin, with the number of bands.
    pub curve: Option<(&'a AreaCurve, usize)>,
}

/// The text of the file, explained in the language of `words`.
pub(super) fn write(known: &Known<'_>, words: &Words) -> String {
    let mut page = Page { text: String::new(), words };
    page.explain("skeleton-head");
    page.explain("skeleton-how");
    page.gap();
    about(known.answers, &mut page);
    station(known.answers, &mut page);
    weather(known.records, &mut page);
    mountain(known, &mut page);
    page.explain("skeleton-usual");
    page.off(USUAL);
    page.gap();
    page.explain("skeleton-reservoir");
    page.off(RESERVOIR);
    page.gap();
    page.explain("skeleton-minimum");
    page.off(MINIMUM);
    page.gap();
    page.line("[sharing]");
    page.explain("skeleton-sharing");
    let rule = known.answers.rule.as_deref().unwrap_or("proportional");
    page.line(&format!("rule = {}", text_value(rule)));
    page.gap();
    page.explain("skeleton-canal");
    // The season that is shown is that of the place's own summer.
    let south = CANAL.replace("\"04-15\"", "\"10-01\"").replace("\"10-15\"", "\"04-15\"");
    page.off(if known.answers.is_southern() { &south } else { CANAL });
    page.gap();
    page.explain("skeleton-town");
    page.off(TOWN);
    page.gap();
    page.explain("skeleton-compare");
    let mut compared = known.records.iter().filter(|record| record.kind != RecordKind::Weather).peekable();
    if compared.peek().is_none() {
        page.off(COMPARED);
    }
    for record in compared {
        page.gap();
        if matches!(record.kind, RecordKind::Gauge { .. }) {
            page.explain("skeleton-gauge");
        }
        page.line(record_table(&record.kind, &record.peek.plan, &record.file).trim_end());
    }
    page.text
}

/// The page as far as it is written.
struct Page<'w> {
    text: String,
    words: &'w Words,
}

impl Page<'_> {
    fn line(&mut self, line: &str) {
        self.text.push_str(line);
        self.text.push('\n');
    }

    fn gap(&mut self) {
        self.text.push('\n');
    }

    /// A message as remarks, broken into lines.
    fn explain(&mut self, id: &str) {
        let message = self.words.say(id, &[]);
        for paragraph in message.lines() {
            let mut line = String::from("#");
            for word in paragraph.split_whitespace() {
                if line.chars().count() + 1 + word.chars().count() > LINE {
                    self.line(&line);
                    line = String::from("#");
                }
                line.push(' ');
                line.push_str(word);
            }
            self.line(&line);
        }
    }

    /// A key with its value, or what is to be filled in.
    fn key(&mut self, id: &str, key: &str, value: Option<String>, example: &str) {
        self.explain(id);
        match value {
            Some(value) => self.line(&format!("{key} = {value}")),
            None => {
                let fill = self.words.say("skeleton-fill", &[]);
                self.line(&format!("# {fill} {key} = {example}"));
            }
        }
    }

    /// Lines that do not count until somebody takes their mark away.
    fn off(&mut self, lines: &str) {
        for line in lines.trim().lines() {
            let marked = if line.is_empty() { "#".to_owned() } else { format!("# {line}") };
            self.line(&marked);
        }
    }
}

fn about(answers: &Answers, page: &mut Page<'_>) {
    page.line("[place]");
    let names = answers.name.as_ref().or(answers.name_es.as_ref()).map(|name| {
        let spanish = answers.name_es.as_ref().unwrap_or(name);
        format!("{{ en = {}, es = {} }}", text_value(name), text_value(spanish))
    });
    page.key("skeleton-name", "name", names, "{ en = \"…\", es = \"…\" }");
    page.key("skeleton-region", "region", answers.region.as_deref().map(text_value), "\"es-CL\"");
    page.key("skeleton-latitude", "latitude_deg", answers.latitude_deg.map(|latitude| latitude.to_string()), "-33.4");
    page.explain("skeleton-year");
    page.off(if answers.is_southern() { CALENDAR_SOUTH } else { CALENDAR_NORTH });
    page.explain("skeleton-source");
    page.off("source = { en = \"…\", es = \"…\" }");
    page.gap();
}

fn station(answers: &Answers, page: &mut Page<'_>) {
    page.line("[station]");
    let (key, value) = match answers.station {
        Some((height, unit)) => (format!("elevation_{unit}"), Some(height.to_string())),
        None => ("elevation_m".to_owned(), None),
    };
    page.key("skeleton-station", &key, value, "1600");
    page.gap();
}

fn weather(records: &[NewRecord], page: &mut Page<'_>) {
    page.explain("skeleton-weather");
    match records.iter().find(|record| record.kind == RecordKind::Weather) {
        Some(record) => page.line(record_table(&record.kind, &record.peek.plan, &record.file).trim_end()),
        None => {
            page.explain("skeleton-weather-missing");
            page.off(WEATHER);
        }
    }
    page.gap();
}

fn mountain(known: &Known<'_>, page: &mut Page<'_>) {
    match known.curve {
        Some((curve, bands)) => {
            page.explain("skeleton-curve");
            page.line(area_table(curve, bands).trim_end());
        }
        None => {
            page.explain("skeleton-bands");
            page.off(BANDS);
        }
    }
    page.gap();
}

const CALENDAR_NORTH: &str = r#"
water_year_starts = "october"
survey_day = "04-01"
spring_months = ["april", "july"]
"#;

const CALENDAR_SOUTH: &str = r#"
water_year_starts = "april"
survey_day = "10-01"
spring_months = ["october", "january"]
"#;

const WEATHER: &str = r#"
[record]
file = "weather.csv"
date = "date"
date_format = "year-month-day"

[record.columns]
temperature_min = { column = "tmin", unit = "°C" }
temperature_max = { column = "tmax", unit = "°C" }
precipitation = { column = "precipitation", unit = "mm" }
"#;

const BANDS: &str = r#"
[[band]]
elevation_m = 2100
area_km2 = 12

[[band]]
elevation_m = 2600
area_km2 = 20
"#;

const USUAL: &str = r#"
[climb]
lapse_c_per_km = -6.5
precipitation_per_100m = 0.05
snow_catch_factor = 1.0

[rain_snow]
all_snow_below_c = 0.0
all_rain_above_c = 3.0

[snow]
melt_factor_mm_c_day = 3.5
melt_swing_mm_c_day = 1.5

[soil]
capacity_mm = 150

[ground]
quick_days = 8
slow_days = 90
"#;

const RESERVOIR: &str = r#"
[reservoir]
capacity_hm3 = 20
dead_hm3 = 1
outlet_m3s = 15
right = 1950

[reservoir.table]
level_m = [1500, 1520, 1540]
area_km2 = [0, 0.6, 1.5]
volume_hm3 = [0, 6, 22]
"#;

const MINIMUM: &str = r#"
[river_minimum]
at = "river_end"
rate_m3s = 0.2
"#;

const CANAL: &str = r#"
[[canal]]
key = "norte"
name = { en = "North", es = "Norte" }
capacity_m3s = 1.5
right = 1910
rate_m3s = 1.2
opens = "04-15"
closes = "10-15"
losses = { length_km = 6, lining = "earth_loam" }

[[canal.field]]
crop = "alfalfa_hay"
area_ha = 120
method = "furrow"
soil = "loam"
"#;

const TOWN: &str = r#"
[[town]]
key = "pueblo"
name = { en = "Town", es = "Pueblo" }
capacity_m3s = 0.1
right = "before_all"
rate_m3s = 0.1
need_m3_day = 1500
"#;

const COMPARED: &str = r#"
[gauge]
measures = "natural"
file = "gauge.csv"
date = "date"
column = "flow"
unit = "m³/s"
"#;
