//! A good place broken on purpose, one fault at a time: each is told once, by its own message, at its line and column.

use deshielo::place::problem::{Argument, Problem, Severity};
use deshielo::place::{Source, read};
use fluent::{FluentArgs, FluentBundle, FluentResource, FluentValue};

const PLACE: &str = include_str!("places/good/place.toml");
const WEATHER: &str = include_str!("places/good/weather.csv");
const RIGHTS: &str = include_str!("places/good/rights.csv");

/// Stands in a replacement where the problem must be shown.
const HERE: char = '‸';

fn problems(place: &str, weather: &str, rights: &str) -> Vec<Problem> {
    let files = [
        ("place.toml", place),
        ("weather.csv", weather),
        ("gauge.csv", include_str!("places/good/gauge.csv")),
        ("snow.csv", include_str!("places/good/snow.csv")),
        ("rights.csv", rights),
        ("lake.csv", "level_m,area_km2,volume_hm3\n2200,0,0\n2210,0.6,x\n2230,1.5,23\n"),
    ];
    let outcome = read(Source::Embedded(&files));
    let errors = outcome.problems.iter().any(|problem| problem.severity == Severity::Error);
    assert_eq!(outcome.place.is_none(), errors, "a place is there exactly when there is no error");
    for problem in &outcome.problems {
        assert_sayable(problem);
    }
    outcome.problems
}

/// Both languages can say the problem and its remedy with the arguments that it brings.
fn assert_sayable(problem: &Problem) {
    let mut arguments = FluentArgs::new();
    for (name, value) in &problem.arguments {
        let value = match value {
            Argument::Text(text) => FluentValue::from(text.clone()),
            Argument::Count(count) => FluentValue::from(*count as f64),
            Argument::Number(number) => FluentValue::from(*number),
            Argument::Date(date) => FluentValue::from(date.to_string()),
        };
        arguments.set(*name, value);
    }
    let texts = [
        ("en", [include_str!("../locales/en/problems.ftl"), include_str!("../locales/en/record-problems.ftl")]),
        ("es", [include_str!("../locales/es/problems.ftl"), include_str!("../locales/es/record-problems.ftl")]),
    ];
    for (language, texts) in texts {
        let mut bundle = FluentBundle::new(vec![language.parse().unwrap()]);
        for text in texts {
            bundle.add_resource(FluentResource::try_new(text.to_owned()).expect("the words can be read")).unwrap();
        }
        let message = bundle.get_message(problem.message).unwrap_or_else(|| panic!("{language}: {}", problem.message));
        let mut errors = Vec::new();
        let says = [message.value(), message.get_attribute("remedy").map(|remedy| remedy.value())];
        for pattern in says {
            let pattern = pattern.unwrap_or_else(|| panic!("{language}: {} is whole", problem.message));
            bundle.format_pattern(pattern, Some(&arguments), &mut errors);
        }
        assert!(errors.is_empty(), "{language}: {}: {errors:?}", problem.message);
    }
}

fn shown(problems: &[Problem]) -> Vec<String> {
    let say = |problem: &Problem| {
        let at = &problem.at;
        format!("{}:{}:{} {} {:?}", at.file.display(), at.line, at.column, problem.message, problem.arguments)
    };
    problems.iter().map(say).collect()
}

/// Line and column of the mark, in characters, and the text without it.
fn without_mark(text: &str) -> (String, usize, usize) {
    let at = text.find(HERE).expect("the case marks where the problem is");
    let before = &text[..at];
    let line = before.matches('\n').count() + 1;
    let column = before.rsplit('\n').next().unwrap_or("").chars().count() + 1;
    (text.replace(HERE, ""), line, column)
}

/// Replaces `old`, which the good place has exactly once.
fn broken(text: &str, old: &str, new: &str) -> String {
    assert_eq!(text.matches(old).count(), 1, "“{old}” must stand exactly once in the good place");
    text.replacen(old, new, 1)
}

/// Every case: what is replaced, by what, with the mark where the problem must be shown; the one message.
const CASES: &[(&str, &str, &str)] = &[
    // The file itself.
    ("latitude_deg = 39.5", "latitude_deg = 39‸,5", "problem-decimal-comma"),
    ("region = \"en-US\"", "region = \"en-US‸", "problem-quote"),
    ("capacity_mm = 140", "capacity_mm = ‸140 mm", "problem-text-unquoted"),
    ("[soil]", "[soil‸", "problem-bracket"),
    ("quick_days = 7", "quick_days = 7\n‸quick_days = 8", "problem-key-twice"),
    ("[ground]\nquick_days = 7", "[ground]\nquick_days ‸7", "problem-syntax"),
    // Keys and tables.
    ("[ground]", "[‸grond]", "problem-table-unknown"),
    ("recharge_power = 2.5", "‸recharge_pwoer = 2.5", "problem-key-unknown"),
    ("slow_days = 80", "‸slow = 80", "problem-key-unit"),
    ("outlet_m3s = 12", "‸outlet_ft3s = 12", "problem-key-unit"),
    ("outlet_m3s = 12", "outlet_m3s = 12\n‸outlet_cfs = 420", "problem-two-units"),
    ("outlet_m3s = 12\n", "", "problem-key-missing@[‸reservoir]"),
    ("[station]\nelevation_m = 2300\n", "", "problem-table-missing@whole"),
    ("[[crop]]", "‸[crop]", "problem-one-bracket"),
    ("hedging = { days_ahead = 30, ends_at = 2.0, starts_at = 0.5 }", "hedging = ‸true", "problem-not-table"),
    // Kinds of value.
    ("capacity_mm = 140", "capacity_mm = ‸\"140\"", "problem-not-number"),
    ("capacity_mm = 140", "capacity_mm = ‸inf", "problem-not-number"),
    ("heat_of_rain = true", "heat_of_rain = ‸\"yes\"", "problem-not-flag"),
    ("spring_months = [\"april\", \"july\"]", "spring_months = ‸\"april\"", "problem-not-list"),
    ("spring_months = [\"april\", \"july\"]", "spring_months = ‸[\"april\"]", "problem-list-length"),
    ("region = \"en-US\"", "region = ‸7", "problem-not-text"),
    ("region = \"en-US\"", "region = ‸\"\"", "problem-text-empty"),
    ("region = \"en-US\"", "region = ‸\"English\"", "problem-region"),
    ("settling_years = 1", "settling_years = ‸1.5", "problem-not-whole"),
    ("dry_share = 0.7", "dry_share = ‸70", "problem-number-range"),
    ("rule = \"seniority\"", "rule = ‸\"senority\"", "problem-choice"),
    // Names.
    ("name = { en = \"Town\", es = \"Pueblo\" }", "name = ‸\"Town\"", "problem-name-one-language"),
    ("name = { en = \"Town\", es = \"Pueblo\" }", "name = ‸{ en = \"Town\" }", "problem-name-language"),
    ("\"es-CL\" = \"Valle", "‸\"es-chile\" = \"Valle", "problem-language-tag"),
    ("key = \"meadow\"", "key = ‸\"Meadow Ditch\"", "problem-key-letters+problem-gate-unknown+problem-key-missing"),
    ("key = \"town\"", "key = \"north\"", "problem-same-key@[[‸town]]+problem-right-twice+problem-gate-unknown"),
    // Dates.
    ("water_year_starts = \"october\"", "water_year_starts = ‸\"octubrre\"", "problem-month"),
    ("water_year_starts = \"october\"", "water_year_starts = ‸13", "problem-month"),
    ("survey_day = \"04-01\"", "survey_day = ‸\"25-04\"", "problem-month-day-swapped"),
    ("survey_day = \"04-01\"", "survey_day = ‸\"02-30\"", "problem-day-impossible"),
    ("survey_day = \"04-01\"", "survey_day = ‸\"1 April\"", "problem-month-day"),
    ("right = 1921", "right = ‸19210", "problem-right-date"),
    ("{ date = \"04-01\", space", "‸{ date = \"11-01\", space", "problem-date-twice"),
    // Place and station.
    ("latitude_deg = 39.5", "latitude_deg = ‸-39.5", "problem-latitude-sign"),
    ("latitude_deg = 39.5", "latitude_deg = ‸0.1", "problem-latitude-zero"),
    ("area_km2 = 139.4", "area_km2 = ‸150", "problem-areas"),
    ("elevation_m = 2300", "elevation_m = ‸3900", "problem-station-above"),
    ("elevation_m = 2300", "elevation_m = ‸8800", "problem-station-feet"),
    ("elevation_m = 2300", "elevation_m = ‸-600", "problem-number-range"),
    ("elevation_m = 2300", "elevation_m = ‸900", "problem-station-far-below"),
    // Slopes.
    ("lapse_c_per_km = -6.0", "lapse_c_per_km = ‸6.0", "problem-lapse-sign"),
    ("lapse_c_per_km = -6.0", "lapse_c_per_km = [-6, -6]", "problem-list-length@[‸climb]"),
    ("precipitation_per_100m = 0.04", "precipitation_per_100m = ‸-0.15", "problem-gradient"),
    ("all_rain_above_c = 2.5", "all_rain_above_c = ‸-1", "problem-rain-snow-order"),
    ("melt_swing_mm_c_day = 1.4", "melt_swing_mm_c_day = ‸4", "problem-melt-swing"),
    ("slow_days = 80", "slow_days = ‸5", "problem-ground-order"),
    ("unit_hydrograph_base_days = 2.5", "unit_hydrograph_base_days = ‸25", "problem-number-range"),
    ("reach_travel_days = 1.0", "reach_travel_days = ‸4", "problem-reach-unstable"),
    ("elevation_m = 2900", "elevation_m = ‸2400", "problem-bands-order"),
    ("method = \"penman_monteith\"", "method = ‸\"given\"", "problem-method-columns"),
    // Reservoir and minimum.
    ("level_m = [2200, 2210, 2220, 2230]", "level_m = [2200, 2210, ‸2205, 2230]", "problem-not-rising"),
    ("area_km2 = [0.0, 0.6, 1.0, 1.5]", "area_km2 = []", "problem-list-length@[‸reservoir.table]"),
    ("level_m = [2200, 2210, 2220, 2230]", "level_m = ‸2200", "problem-not-list"),
    (
        "level_m = [2200, 2210, 2220, 2230]",
        "level_m = [2200, 2210, 2220, 2230]\n‸level_ft = [1, 2, 3, 4]",
        "problem-two-units",
    ),
    ("area_km2 = [0.0, 0.6, 1.0, 1.5]", "area_km2 = [0.0, 1.2, ‸1.0, 1.5]", "problem-lake-shrinks"),
    ("volume_hm3 = [0, 3, 11, 23.4]", "volume_hm3 = [0, 3, 23.4]", "problem-list-length@[‸reservoir.table]"),
    (
        "volume_hm3 = [0, 3, 11, 23.4]",
        "volume_acre_feet = [0, 3, 11, 23.4]",
        "problem-table-units@[‸reservoir.table]+problem-capacity-above-table",
    ),
    ("capacity_hm3 = 22", "capacity_hm3 = ‸1.2", "problem-capacity-below-dead"),
    ("capacity_hm3 = 22", "capacity_hm3 = ‸30", "problem-capacity-above-table"),
    ("volume_hm3 = [0, 3, 11, 23.4]", "volume_hm3 = [2, 3, 11, 23.4]", "problem-dead-below-table@dead_hm3 = ‸1.5"),
    ("space_hm3 = 5 }", "space_hm3 = ‸21 }", "problem-flood-space"),
    ("rate_m3s = 0.5 }", "rate_m3s = ‸15 }", "problem-minimum-above-outlet"),
    ("right = \"before_all\"", "right = \"before_all\"\nrate_m3s = ‸1", "problem-minimum-twice"),
    (
        "level_m = [2200, 2210, 2220, 2230]\narea_km2 = [0.0, 0.6, 1.0, 1.5]\nvolume_hm3 = [0, 3, 11, 23.4]",
        "file = ‸\"../lake.csv\"",
        "problem-file-outside",
    ),
    // Canals, rights and towns.
    ("opens = \"04-15\"\ncloses = \"10-15\"", "opens = \"10-15\"\ncloses = ‸\"04-15\"", "problem-season-backwards"),
    ("opens = \"04-15\"\ncloses = \"10-15\"", "opens = \"10-20\"\ncloses = ‸\"12-15\"", "problem-season-winter"),
    ("opens = \"04-15\"\ncloses = \"10-15\"", "opens = \"04-15\"\ncloses = ‸\"04-17\"", "problem-season-short"),
    ("opens = \"04-15\"\ncloses", "closes", "problem-key-missing@[[canal]]\nkey = \"north\""),
    ("rate_m3s = 0.2\n", "rate_m3s = ‸200\n", "problem-right-too-large"),
    ("rate_m3s = 0.2\n", "rate_m3s = ‸0.8\n", "problem-right-above-canal"),
    ("capacity_m3s = 2.4", "capacity_m3s = ‸2400", "problem-canal-far-too-large"),
    ("capacity_m3s = 2.4", "capacity_m3s = ‸0.2", "problem-canal-small+problem-right-above-canal+problem-limit-idle"),
    ("storage_share = 0.2\n", "storage_share = ‸0.7\n", "problem-storage-shares"),
    ("returns_above = \"town\"", "returns_above = ‸\"north\"", "problem-return-uphill"),
    ("returns_above = \"town\"", "returns_above = ‸\"twon\"", "problem-gate-unknown"),
    ("turn_days = 6", "turn_days = ‸2.5", "problem-not-whole"),
    ("turn_days = 6", "turn_days = 6\nposition = 1", "problem-position-missing@[[‸town]]"),
    ("right = 1935", "right = 1935\nloss_percent = ‸99", "problem-number-range"),
    (
        "losses = { length_km = 6, lining = \"earth_loam\" }",
        "losses = { length_km = 6, lining = ‸\"loam\" }",
        "problem-choice",
    ),
    (
        "losses = { length_km = 6, lining = \"earth_loam\" }",
        "losses = ‸{ length_km = 60, wetted_perimeter_m = 6, bed = \"porous_gravel\" }",
        "problem-loss-too-large",
    ),
    (
        "losses = { length_km = 6, lining = \"earth_loam\" }",
        "losses = { length_km = 6, lining = \"lined\" }\nloss_share = ‸0.3",
        "problem-either",
    ),
    ("yearly_limit_hm3 = 30", "yearly_limit_hm3 = ‸24000", "problem-limit-idle"),
    (
        "level_m = [2200, 2210, 2220, 2230]",
        "level_m = [7200, 7210, 7220, 7230]",
        "problem-lake-above-land@[‸reservoir.table]",
    ),
    ("summer = { from = \"06-01\", to = \"08-31\" }\n", "", "problem-key-missing@[[‸town]]"),
    ("column = \"caudal\"", "column = ‸\"flow\"", "problem-record-column-missing"),
    // Fields and crops.
    ("crop = \"maize_grain\"", "crop = ‸\"maize_grian\"", "problem-crop-unknown"),
    ("efficiency_share = 0.7", "method = \"drip\"\nefficiency_share = ‸0.7", "problem-either"),
    ("soil = \"sandy_loam\"", "soil = ‸\"sandi_loam\"", "problem-choice"),
    ("swap_from = \"alfalfa_hay\"", "swap_from = ‸\"onion_dry\"", "problem-swap-absent"),
    ("swap_to = \"fallow\"", "swap_to = ‸\"alfalfa_hay\"", "problem-swap-same"),
    ("stage_days = [20, 35, 50, 30]", "stage_days = [‸200, 135, 50, 30]", "problem-crop-stages"),
    // Dials.
    ("reservoir_size = \"hidden\"", "‸reservoir_sise = \"hidden\"", "problem-dial-unknown"),
    ("reservoir_size = \"hidden\"", "reservoir_size = ‸false", "problem-dial-form"),
    (
        "warming = { least = 0, most = 4, step = 0.5 }",
        "warming = { least = 0, most = ‸9, step = 0.5 }",
        "problem-number-range",
    ),
    ("warming = { least = 0, most = 4, step = 0.5 }", "warming = ‸{ least = 2, most = 4 }", "problem-dial-range"),
    // Records.
    ("file = \"weather.csv\"", "file = ‸\"wether.csv\"", "problem-file-missing"),
    ("date_format = \"year-month-day\"", "date_format = ‸\"month\"", "problem-choice"),
    ("column = \"tmin_c\", unit = \"°C\"", "column = \"tmin_c\", unit = ‸\"mm\"", "problem-choice"),
    ("measures = \"natural\"", "measures = ‸\"inflow\"", "problem-choice"),
    ("measures = \"natural\"\n", "", "problem-key-missing@[‸gauge]"),
    ("settling_years = 1", "settling_years = ‸5", "problem-settling-long"),
];

/// The whole text is changed by `change`; the first problem must be `message`, at `line` and `column` of `file`.
#[track_caller]
fn told_first(place: &str, weather: &str, rights: &str, message: &str, at: (&str, usize, usize)) {
    let told = problems(place, weather, rights);
    let found = told
        .iter()
        .filter(|problem| problem.message == message)
        .any(|problem| (problem.at.file.to_str(), problem.at.line, problem.at.column) == (Some(at.0), at.1, at.2));
    assert!(found, "wanted {message} at {at:?}, told {:#?}", shown(&told));
}

/// Line of the first line that starts so.
fn line_of(text: &str, start: &str) -> usize {
    text.lines().position(|line| line.starts_with(start)).expect("the line is there") + 1
}

#[test]
fn more_than_there_is_room_for() {
    let band = "[[band]]\nelevation_m = 3400\narea_km2 = 0.001\n";
    let text = broken(PLACE, "[reservoir]\n", &format!("{}[reservoir]\n", band.repeat(30)));
    let beyond = line_of(&text, "[reservoir]") - 3;
    told_first(&text, WEATHER, RIGHTS, "problem-too-many-bands", ("place.toml", beyond, 1));

    // The areas of bands that do not fit are not missed in the sum.
    let told = problems(&text, WEATHER, RIGHTS);
    assert!(told.iter().all(|problem| problem.message != "problem-areas"), "{:?}", shown(&told));

    let field = "[[canal.field]]\ncrop = \"oats\"\narea_ha = 0.1\nmethod = \"drip\"\n\n";
    let text = broken(PLACE, "[[town]]\n", &format!("{}[[town]]\n", field.repeat(7)));
    let beyond = line_of(&text, "[[town]]") - 5;
    told_first(&text, WEATHER, RIGHTS, "problem-too-many-fields", ("place.toml", beyond, 1));

    let town = |number: usize| {
        format!(
            "[[town]]\nkey = \"t{number}\"\nname = {{ en = \"T\", es = \"P\" }}\nright = 1990\nrate_m3s = 0.01\n\
             capacity_m3s = 0.01\nneed_m3_day = 500\n\n"
        )
    };
    let towns: String = (0..22).map(town).collect();
    let text = broken(PLACE, "[[crop]]\n", &format!("{towns}[[crop]]\n"));
    let beyond = line_of(&text, "[[crop]]") - 8;
    told_first(&text, WEATHER, RIGHTS, "problem-too-many-gates", ("place.toml", beyond, 1));

    let levels: Vec<String> = (0..49).map(|step| (2200 + step).to_string()).collect();
    let text = broken(PLACE, "[2200, 2210, 2220, 2230]", &format!("[{}]", levels.join(", ")));
    let table = line_of(&text, "[reservoir.table]");
    told_first(&text, WEATHER, RIGHTS, "problem-too-many-points", ("place.toml", table, 1));
}

/// What a message says under one of its names.
fn argument<'a>(told: &'a [Problem], message: &str, name: &str) -> Option<&'a Argument> {
    let problem = told.iter().find(|problem| problem.message == message)?;
    problem.arguments.iter().find(|(key, _)| *key == name).map(|(_, value)| value)
}

#[test]
fn what_is_offered_is_what_was_meant() {
    // A part of a name says more than its first letters.
    let text = broken(PLACE, "measures = \"natural\"", "measures = \"inflow\"");
    let told = problems(&text, WEATHER, RIGHTS);
    assert_eq!(argument(&told, "problem-choice", "nearest"), Some(&Argument::Text("computed_inflow".into())));
    // Keys are named as the file writes them.
    let text = broken(PLACE, "lapse_c_per_km = -6.0", "lapse_f_per_1000ft = [-3.3]");
    let told = problems(&text, WEATHER, RIGHTS);
    assert_eq!(argument(&told, "problem-list-length", "key"), Some(&Argument::Text("lapse_f_per_1000ft".into())));
    // A wrong capacity is told once, not as an area that does not add up as well.
    let text = broken(PLACE, "capacity_hm3 = 22", "capacity_hm3 = -22");
    let told = problems(&text, WEATHER, RIGHTS);
    assert_eq!(told.len(), 1, "{:?}", shown(&told));
}

#[test]
fn a_canal_without_fields_is_told_how_one_begins() {
    let end = PLACE.find("[[canal.field]]").unwrap();
    let next = end + PLACE[end..].find("[[town]]").or(PLACE[end..].find("\n[[canal]]")).unwrap();
    let text = format!("{}{}", &PLACE[..end], &PLACE[next..]);
    let told = problems(&text, WEATHER, RIGHTS);
    assert_eq!(argument(&told, "problem-tables-missing", "table"), Some(&Argument::Text("canal".into())));
}

#[test]
fn faults_that_need_more_than_one_line() {
    let rotation = broken(PLACE, "rule = \"seniority\"", "rule = \"rotation\"");
    let no_turns = rotation.replace("turn_days = 6\n", "").replace("turn_days = 4\n", "");
    let first = line_of(&no_turns, "[[canal]]");
    told_first(&no_turns, WEATHER, RIGHTS, "problem-no-turns", ("place.toml", first, 1));

    let twice = PLACE.replace("turn_days = 6\n", "position = 2\n").replace("turn_days = 4\n", "position = 3\n");
    let twice = broken(&twice, "right = 1935\n", "right = 1935\nposition = 3\n");
    let second = line_of(&twice, "losses = ") + 2;
    told_first(&twice, WEATHER, RIGHTS, "problem-position-twice", ("place.toml", second, 12));

    let start = PLACE.find("[reservoir]").unwrap();
    let dry = format!("{}{}", &PLACE[..start], &PLACE[PLACE.find("[river_minimum]").unwrap()..]);
    let share = line_of(&dry, "storage_share = 0.4");
    told_first(&dry, WEATHER, RIGHTS, "problem-share-without-reservoir", ("place.toml", share, 17));
    let dry = broken(&dry, "reservoir_size = \"hidden\"", "reservoir_size = { most = 50 }");
    let dial = line_of(&dry, "reservoir_size");
    told_first(&dry, WEATHER, RIGHTS, "problem-dial-lacking", ("place.toml", dial, 1));

    let lines = ["level_m = [2200", "area_km2 = [0.0", "volume_hm3 = [0"];
    let kept = PLACE.lines().filter(|line| !lines.iter().any(|start| line.starts_with(start)));
    let filed = kept.collect::<Vec<_>>().join("\n");
    let filed = broken(&filed, "[reservoir.table]", "[reservoir.table]\nfile = \"lake.csv\"");
    told_first(&filed, WEATHER, RIGHTS, "problem-cell-not-number", ("lake.csv", 3, 10));

    let both = broken(PLACE, "[[crop]]", "[area_elevation]\nelevation_m = [1, 2]\narea_below_km2 = [0, 1]\n[[crop]]");
    let band = line_of(&both, "[[band]]");
    told_first(&both, WEATHER, RIGHTS, "problem-bands-and-curve", ("place.toml", band, 1));

    let no_humidity = PLACE.replace("relative_humidity_mean = { column = \"humidity\", unit = \"%\" }\n", "");
    let wet = broken(&no_humidity, "wet_bulb = false", "wet_bulb = true");
    let line = line_of(&wet, "wet_bulb");
    told_first(&wet, WEATHER, RIGHTS, "problem-wet-bulb-humidity", ("place.toml", line, 12));

    let no_min = PLACE.replace("temperature_min = { column = \"tmin_c\", unit = \"°C\" }\n", "");
    let columns = line_of(&no_min, "[record.columns]");
    told_first(&no_min, WEATHER, RIGHTS, "problem-key-missing", ("place.toml", columns, 1));
}

#[test]
fn faults_in_the_other_files() {
    told_first(PLACE, WEATHER, &RIGHTS.replace("meadow", "medow"), "problem-gate-unknown", ("rights.csv", 4, 1));
    told_first(PLACE, WEATHER, &RIGHTS.replace("1882", "long ago"), "problem-right-date", ("rights.csv", 3, 7));
    told_first(PLACE, WEATHER, &RIGHTS.replace("2.0", "2000"), "problem-right-too-large", ("rights.csv", 3, 12));
    told_first(PLACE, WEATHER, &RIGHTS.replace("2.0", "two"), "problem-cell-not-number", ("rights.csv", 3, 12));
    told_first(PLACE, WEATHER, &RIGHTS.replace("rate_m3s", "rate"), "problem-column-unknown", ("rights.csv", 2, 11));
    told_first(PLACE, WEATHER, &RIGHTS.replace("north,", ","), "problem-cell-empty", ("rights.csv", 3, 1));
    told_first(PLACE, WEATHER, &RIGHTS.replace(",0.9", ",0.9,7"), "problem-row-length", ("rights.csv", 4, 1));
    let short: Vec<&str> = WEATHER.lines().take(200).collect();
    let file = line_of(PLACE, "file = \"weather.csv\"");
    told_first(PLACE, &short.join("\n"), RIGHTS, "problem-record-short", ("place.toml", file, 8));
    let later = WEATHER.replace("\n2001-", "\n2011-").replace("\n2002-", "\n2012-").replace("\n2003-", "\n2013-");
    // 2012 is a leap year and 2002 is not.
    let later = later.replace("\n2012-03-01", "\n2012-02-29,-8.0,3.0,0.0,60,2.0,15.0\n2012-03-01");
    let gauge = line_of(PLACE, "file = \"gauge.csv\"");
    told_first(PLACE, &later, RIGHTS, "problem-record-apart", ("place.toml", gauge, 8));
    let far = WEATHER.replacen("2001-10-05,", "2001-10-05,9", 1);
    let told = problems(PLACE, &far, RIGHTS);
    assert!(told.iter().any(|told| told.at.file.to_str() == Some("weather.csv") && told.at.line == 7), "{told:#?}");
}

#[test]
fn a_place_without_its_file_says_so() {
    let outcome = read(Source::Embedded(&[]));
    assert_eq!(shown(&outcome.problems), ["place.toml:0:0 problem-file-missing [(\"file\", Text(\"place.toml\"))]"]);
    let outcome = read(Source::Folder(std::path::Path::new("tests/places/nowhere")));
    assert_eq!(outcome.problems[0].message, "problem-file-missing");
}

#[test]
fn many_faults_are_told_together() {
    let text = broken(PLACE, "latitude_deg = 39.5", "latitude_deg = 395");
    let text = broken(&text, "recharge_power = 2.5", "recharge_pwoer = 2.5");
    let text = broken(&text, "crop = \"maize_grain\"", "crop = \"maize\"");
    let told = problems(&text, WEATHER, &RIGHTS.replace("2.0", "two"));
    let messages: Vec<&str> = told.iter().map(|problem| problem.message).collect();
    assert_eq!(
        messages,
        ["problem-number-range", "problem-key-unknown", "problem-crop-unknown", "problem-cell-not-number"]
    );
}

/// Cases whose problem stands elsewhere than in the replacement say where after `@`; other messages that follow from the
/// same fault are named after `+`.
#[test]
fn every_fault_is_told_at_its_place() {
    let mut wrong = Vec::new();
    for (old, new, expected) in CASES {
        let (expected, place) = expected.split_once('@').unwrap_or((expected, ""));
        let (first, also) = expected.split_once('+').unwrap_or((expected, ""));
        let (place, also) = place.split_once('+').map_or((place, also), |(place, also)| (place, also));
        let text = broken(PLACE, old, new);
        let (text, line, column) = match place {
            "" => without_mark(&text),
            "whole" => (text, 0, 0),
            place => {
                let bare = place.replace(HERE, "");
                assert_eq!(text.matches(&bare).count(), 1, "{place}");
                let start = text.find(&bare).unwrap();
                let end = place.find(HERE).unwrap_or(0);
                let (_, line, column) = without_mark(&format!("{}{HERE}", &text[..start + end]));
                // A heading is shown from its first bracket.
                (text, line, if place.starts_with('[') { 1 } else { column })
            }
        };
        let told = problems(&text, WEATHER, RIGHTS);
        let also: Vec<&str> = also.split('+').filter(|message| !message.is_empty()).collect();
        let here = |problem: &&Problem| {
            problem.message == first
                && (problem.at.line, problem.at.column) == (line, column)
                && problem.at.file.to_str() == Some("place.toml")
        };
        let others: Vec<&str> =
            told.iter().map(|problem| problem.message).filter(|message| *message != first).collect();
        if told.iter().filter(here).count() != 1 || others.iter().any(|other| !also.contains(other)) {
            wrong.push(format!("{old:?} → {new:?}\n  wanted {first} at {line}:{column}\n  told {:#?}", shown(&told)));
        }
    }
    assert!(wrong.is_empty(), "{} of {} cases:\n{}", wrong.len(), CASES.len(), wrong.join("\n"));
    assert!(CASES.len() >= 100);
}
