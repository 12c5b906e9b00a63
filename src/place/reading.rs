//! From the files of a place to its checked values, with everything that is wrong told on the way.

use super::crops::Crops;
use super::dated::{month, month_day_or};
use super::fields::on_field;
use super::gates::{ReadGate, rule};
use super::problem::{Problem, Severity};
use super::record::Measure;
use super::records::{NamedRecord, gauge, series, weather};
use super::rights_file::RightsFile;
use super::section::{Limits, Number, Section};
use super::source::Source;
use super::station_days::{evaporation, has_humidity, station_days};
use super::text::{Text, is_region_tag, need_names, optional_names};
use super::tree::Sheet;
use super::unit_suffix::{AREA_KM2, METRES, PLAIN, SHARE};
use super::{Diversion, FilledGaps, Notes, Outcome, Place, RecordNote, UnitSystem};
use super::{bands, checks, dial_plan, gates, reservoir, slopes};
use chrono::Days;

use crate::water::calendar::{CalendarDay, MonthDay, fill_calendar};
use crate::water::run::water_years;
use crate::water::valley::{MOST_FIELDS, MOST_GATES, Purpose, Valley};

/// Reads a place: all of it, or everything that is wrong with it.
///
/// Problems come in the order of the files and their lines; [`Outcome::place`] is there when none of them is an error.
pub fn read(source: Source<'_>) -> Outcome {
    let text = match source.place_text() {
        Ok(text) => text,
        Err(problem) => return Outcome { place: None, problems: vec![problem] },
    };
    let (sheet, table) = Sheet::parse(source.shown("place.toml"), &text);
    // The root is asked last and judged when it ends, before the problems are taken out.
    let place = place(&Section::root(&sheet, &table), source);
    let mut problems = sheet.problems.take();
    // The place's own file comes first: a record cannot be right before its columns are.
    let rank = |problem: &Problem| problem.at.file != sheet.file;
    problems.sort_by(|a, b| rank(a).cmp(&rank(b)).then_with(|| a.at.cmp(&b.at)).then_with(|| a.message.cmp(b.message)));
    problems.dedup();
    let fine = problems.iter().all(|problem| problem.severity < Severity::Error);
    Outcome { place: place.filter(|_| fine), problems }
}

/// What `[place]` says.
struct About {
    name: Text,
    region: String,
    units: UnitSystem,
    latitude: Number,
    water_year_start_month: u8,
    survey: Option<MonthDay>,
    spring_months: Option<(u8, u8)>,
    enough_share: f64,
    area: Option<Number>,
    invented: bool,
    source: Option<Text>,
}

fn about(root: &Section<'_>) -> About {
    let section = root.section("place");
    section.tell_if_absent();
    let latitude = section.need_number("latitude_deg", PLAIN, Limits(-66.0, 66.0));
    if latitude.value.abs() < 0.5 {
        // The hemisphere decides when winter is; at the line itself nothing does.
        section.sheet.tell(Problem::error(latitude.at.clone(), "problem-latitude-zero").with("value", latitude.value));
    }
    let units = section.choice("units", &[("metric", UnitSystem::Metric), ("us", UnitSystem::Us)]);
    let region = region(&section);
    let usual_units = if region.ends_with("-US") { UnitSystem::Us } else { UnitSystem::Metric };
    About {
        name: need_names(&section, "name"),
        units: units.map_or(usual_units, |(units, _)| units),
        region,
        water_year_start_month: section.get("water_year_starts").map_or_else(
            || if latitude.value < 0.0 { 4 } else { 10 },
            |value| month(&section, "water_year_starts", value).unwrap_or(10),
        ),
        survey: section.peek("survey_day").map(|_| month_day_or(&section, "survey_day", APRIL)),
        spring_months: spring_months(&section),
        enough_share: section.number_or("enough", SHARE, Limits(0.01, 1.0), 0.9).value,
        area: section.number("area", AREA_KM2, Limits(0.001, 1.0e6)),
        invented: section.flag_or("invented", false),
        source: optional_names(&section, "source"),
        latitude,
    }
}

/// Snow surveys of the north are made on the first of April, those of the south half a year later.
const APRIL: MonthDay = MonthDay { month: 4, day: 1 };
const OCTOBER: MonthDay = MonthDay { month: 10, day: 1 };

fn region(section: &Section<'_>) -> String {
    let Some((region, at)) = section.need_text("region") else { return String::new() };
    if !is_region_tag(region) {
        section.sheet.tell(Problem::error(at, "problem-region").with("value", region));
    }
    region.to_owned()
}

fn spring_months(section: &Section<'_>) -> Option<(u8, u8)> {
    let list = section.list("spring_months")?;
    if list.len() != 2 {
        let at = section.peek("spring_months").map_or_else(|| section.at.clone(), |value| section.value_at(value));
        let problem = Problem::error(at, "problem-list-length").with("key", "spring_months");
        section.sheet.tell(problem.with("found", list.len()).with("wanted", 2usize));
        return None;
    }
    Some((month(section, "spring_months", &list[0])?, month(section, "spring_months", &list[1])?))
}

fn place(root: &Section<'_>, source: Source<'_>) -> Option<Place> {
    let about = about(root);
    let station = {
        let section = root.section("station");
        section.tell_if_absent();
        section.need_number("elevation", METRES, bands::ELEVATION)
    };
    let (climb, gradient) = slopes::climb(root);
    let (weather, wind_height_m) = weather(root, source);
    let record = weather.as_ref().map(|named| &named.record);
    let calendar = calendar(root, &about, weather.as_ref());
    let southern = checks::is_southern(root, &about.latitude, &calendar, record);
    let humidity = record.is_none_or(has_humidity);
    let (evaporation, evaporation_note) = evaporation(root, record, station.value);

    let crops = Crops::read(root, southern);
    let (rule, rights) = {
        let sharing = root.section("sharing");
        sharing.tell_if_absent();
        (rule(&sharing), RightsFile::read(&sharing, source))
    };
    let mut read_gates = gates::read(root, rule, &rights, &crops);
    swap_crops(root, &crops, &mut read_gates);
    let reservoir = reservoir::read(root, source);
    let minimum = reservoir::minimum(root);
    let (start, settling) = slopes::start(root);
    let whole_years = water_years(&calendar, about.water_year_start_month).count();
    if settling.value > whole_years as f64 && whole_years > 0 {
        let problem = Problem::error(settling.at.clone(), "problem-settling-long");
        root.sheet.tell(problem.with("value", settling.value).with("years", whole_years));
    }

    let mut bands = bands::read(root);
    let lake_km2 = reservoir.as_ref().map_or(0.0, |read| checks::largest_lake_km2(&read.reservoir));
    let fields_km2 = checks::fields_km2(&read_gates);
    take_out(root, &mut bands, lake_km2, fields_km2);
    checks::areas(root, about.area.as_ref(), &bands, lake_km2, fields_km2);
    checks::station(root, &station, &bands, &climb, &gradient);
    checks::gates(root, &read_gates, reservoir.as_ref(), rule, southern);
    checks::outlet(root, reservoir.as_ref(), &minimum);
    checks::lake_level(root, reservoir.as_ref(), &bands);

    let comparisons = Comparisons::read(root, source, &read_gates);
    comparisons.check_overlap(root, weather.as_ref());

    let (gates, names) = finished_gates(read_gates);
    let valley = Valley {
        latitude_deg: about.latitude.value,
        water_year_start_month: about.water_year_start_month,
        station_elevation_m: station.value,
        climb,
        rain_snow: slopes::rain_snow(root, humidity),
        snow: slopes::snow(root),
        evaporation,
        soil: slopes::soil(root),
        ground: slopes::ground(root),
        channel: slopes::channel(root),
        bands: bands.bands,
        reservoir: reservoir.map(|read| read.reservoir),
        gates,
        minimum: minimum.minimum,
        rule,
        start,
        enough_share: about.enough_share,
        survey: about.survey.unwrap_or(if southern { OCTOBER } else { APRIL }),
        spring_months: about.spring_months.unwrap_or(if southern { (10, 1) } else { (4, 7) }),
    };
    let dials = dial_plan::read(root, &valley);
    let weather = weather?;
    let days = station_days(&weather.record, &calendar, &valley, wind_height_m);
    Some(Place {
        folder: match source {
            Source::Folder(folder) => Some(folder.to_owned()),
            Source::Embedded(_) => None,
        },
        name: about.name,
        region: about.region,
        units: about.units,
        source: about.source,
        invented: about.invented,
        first_date: weather.record.first_date,
        valley,
        calendar,
        days,
        gates: names,
        dials,
        notes: notes(evaporation_note, &weather, &comparisons),
        gauge: comparisons.gauge.map(|(gauge, _)| gauge),
        snow_record: comparisons.snow.map(|(series, _)| series),
        snow_elevation_m: comparisons.snow_elevation_m,
        storage_record: comparisons.storage.map(|(series, _)| series),
        diversions: comparisons.diversions.into_iter().map(|(diversion, _)| diversion).collect(),
    })
}

/// Takes lake and fields out of the bands of a curve that holds them.
fn take_out(root: &Section<'_>, bands: &mut bands::ReadBands, lake_km2: f64, fields_km2: f64) {
    let total: f64 = bands.bands.iter().map(|band| band.area_km2).sum();
    let lake = if bands.holds_lake { lake_km2 } else { 0.0 };
    let inside = lake + if bands.holds_fields { fields_km2 } else { 0.0 };
    if inside.is_nan() || total == 0.0 {
        return;
    }
    if inside >= total {
        let problem = Problem::error(bands.at.clone(), "problem-areas-inside");
        root.sheet.tell(problem.with("inside", inside).with("found", total));
        return;
    }
    bands::take_from_lowest(&mut bands.bands, inside);
}

/// Reads `[crop_mix]` and tells each field what the crop-mix dial makes of it.
fn swap_crops(root: &Section<'_>, crops: &Crops, gates: &mut [ReadGate]) {
    let section = root.section("crop_mix");
    if !section.present {
        return;
    }
    let (from, to) = (section.need_text("swap_from"), section.need_text("swap_to"));
    let (Some((from, from_at)), Some((to, to_at))) = (from, to) else { return };
    if from == to {
        section.sheet.tell(Problem::error(to_at, "problem-swap-same").with("value", to));
        return;
    }
    let (Some(_), Some(crop)) = (crops.find(&section, from, &from_at), crops.find(&section, to, &to_at)) else {
        return;
    };
    let fields = gates.iter_mut().flat_map(|gate| &mut gate.fields);
    let mut touched = false;
    for read in fields.filter(|read| read.names.crop == from) {
        let now = read.field.crop;
        read.field.swap_to = Some(on_field(&crop, now.refill_to_share, now.off_season_coefficient));
        touched = true;
    }
    if !touched {
        section.sheet.tell(Problem::error(from_at, "problem-swap-absent").with("value", from));
    }
}

/// Puts the fields into their gates; what is beyond the limits was told.
fn finished_gates(
    read: Vec<ReadGate>,
) -> (heapless::Vec<crate::water::valley::Gate, MOST_GATES>, Vec<super::GateNames>) {
    let (mut gates, mut names) = (heapless::Vec::new(), Vec::new());
    for mut gate in read.into_iter().take(MOST_GATES) {
        if let Purpose::Fields(fields) = &mut gate.gate.purpose {
            fields.extend(gate.fields.iter().take(MOST_FIELDS).map(|read| read.field));
        }
        gate.names.fields = gate.fields.into_iter().map(|read| read.names).collect();
        names.push(gate.names);
        gates.extend([gate.gate]);
    }
    (gates, names)
}

/// The days of the record, which must have a whole water year at least.
fn calendar(root: &Section<'_>, about: &About, weather: Option<&NamedRecord>) -> Vec<CalendarDay> {
    let Some(weather) = weather else { return Vec::new() };
    let first = CalendarDay::new(weather.record.first_date, about.water_year_start_month);
    let mut calendar = vec![first; weather.record.days];
    fill_calendar(weather.record.first_date, about.water_year_start_month, &mut calendar);
    if water_years(&calendar, about.water_year_start_month).count() == 0 {
        let problem = Problem::error(weather.at.clone(), "problem-record-short");
        root.sheet.tell(problem.with("days", calendar.len()));
    }
    calendar
}

/// The records that a run is compared with.
struct Comparisons {
    gauge: Option<(super::Gauge, NamedRecord)>,
    snow: Option<(super::Series, NamedRecord)>,
    snow_elevation_m: Option<f64>,
    storage: Option<(super::Series, NamedRecord)>,
    diversions: Vec<(Diversion, NamedRecord)>,
}

impl Comparisons {
    fn read(root: &Section<'_>, source: Source<'_>, gates: &[ReadGate]) -> Self {
        let one = |key: &'static str, measure| {
            let section = root.section(key);
            section.present.then(|| series(&section, source, measure)).flatten()
        };
        let snow = root.section("snow_record");
        let elevation = if snow.present { snow.number("elevation", METRES, bands::ELEVATION) } else { None };
        Self {
            gauge: gauge(root, source),
            snow: snow.present.then(|| series(&snow, source, Measure::SnowWater)).flatten(),
            snow_elevation_m: elevation.map(|number| number.value),
            storage: one("storage_record", Measure::Storage),
            diversions: root
                .sections("diversion_record")
                .iter()
                .filter_map(|section| diversion(section, source, gates))
                .collect(),
        }
    }
}

impl Comparisons {
    /// A record that shares no day with the weather has nothing to be compared with.
    fn check_overlap(&self, root: &Section<'_>, weather: Option<&NamedRecord>) {
        let Some(weather) = weather else { return };
        let last =
            |named: &NamedRecord| named.record.first_date + Days::new(named.record.days.saturating_sub(1) as u64);
        let others = self.gauge.iter().map(|(_, named)| named);
        let others = others.chain([&self.snow, &self.storage].into_iter().flatten().map(|(_, named)| named));
        for named in others.chain(self.diversions.iter().map(|(_, named)| named)) {
            if named.record.first_date > last(weather) || last(named) < weather.record.first_date {
                root.sheet.tell(
                    Problem::warning(named.at.clone(), "problem-record-apart")
                        .with("first", named.record.first_date)
                        .with("last", last(named))
                        .with("weather_first", weather.record.first_date)
                        .with("weather_last", last(weather)),
                );
            }
        }
    }
}

fn diversion(section: &Section<'_>, source: Source<'_>, gates: &[ReadGate]) -> Option<(Diversion, NamedRecord)> {
    let gate = section.need_text("gate").and_then(|(key, at)| {
        let found = gates.iter().position(|gate| gate.names.key == key);
        if found.is_none() {
            let problem = Problem::error(at, "problem-gate-unknown").with("value", key);
            section.sheet.tell(problem.with_nearest(key, gates.iter().map(|gate| gate.names.key.as_str())));
        }
        found
    });
    let (series, named) = series(section, source, Measure::Diversion)?;
    Some((Diversion { gate: gate?, series }, named))
}

fn notes(evaporation: super::EvaporationNote, weather: &NamedRecord, comparisons: &Comparisons) -> Notes {
    let mut records = vec![RecordNote { file: weather.file.clone(), checksum: weather.record.checksum }];
    let compared = [&comparisons.snow, &comparisons.storage].into_iter().flatten().map(|(_, named)| named);
    let gauge = comparisons.gauge.iter().map(|(_, named)| named);
    let diversions = comparisons.diversions.iter().map(|(_, named)| named);
    for named in gauge.chain(compared).chain(diversions) {
        records.push(RecordNote { file: named.file.clone(), checksum: named.record.checksum });
    }
    let filled = weather.record.columns.iter().filter(|column| column.filled > 0);
    Notes {
        evaporation,
        filled_gaps: filled
            .map(|column| FilledGaps {
                measure: column.measure,
                days: column.filled,
                longest_days: column.longest_gap_days,
            })
            .collect(),
        records,
    }
}
