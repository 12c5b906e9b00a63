//! Places of other shapes: the least that a place needs, a curve instead of bands, the south, turns, no dam.

use chrono::NaiveDate;
use deshielo::place::problem::{Problem, Severity};
use deshielo::place::{DialOffer, EvaporationChoice, Outcome, Source, read};
use deshielo::water::calendar::MonthDay;
use deshielo::water::dials::Dial;
use deshielo::water::units::{M_PER_FOOT, M2_PER_ACRE};
use deshielo::water::valley::Purpose;

/// A smooth year's weather, with the warm months of the north or of the south.
fn weather(southern: bool, mean_only: bool) -> String {
    let mut text = String::from(if mean_only { "day,mean,wet\n" } else { "day,low,high,wet\n" });
    let mut date = NaiveDate::from_ymd_opt(1999, 1, 1).unwrap();
    for day in 0..1461usize {
        let from_july = (day % 365).abs_diff(196) as f64;
        let warmth = if southern { from_july / 12.0 - 2.0 } else { 13.0 - from_july / 12.0 };
        let wet = if day % 4 == 0 { (day % 13) as f64 } else { 0.0 };
        let wobble = (day * 7 % 11) as f64 / 4.0;
        let middle = warmth + wobble;
        text += &match mean_only {
            true => format!("{date},{middle:.1},{wet}\n"),
            false => format!("{date},{:.1},{:.1},{wet}\n", middle - 6.0, middle + 6.5),
        };
        date = date.succ_opt().unwrap();
    }
    text
}

const HEAD: &str = r#"
[place]
name = { en = "Least", es = "Lo mínimo" }
region = "es-CL"
latitude_deg = -33.0

[station]
elevation_m = 1600

[record]
file = "weather.csv"
date = "day"

[record.columns]
temperature_min = { column = "low", unit = "°C" }
temperature_max = { column = "high", unit = "°C" }
precipitation = { column = "wet", unit = "mm" }

[sharing]
rule = "rotation"
"#;

const BAND: &str = "\n[[band]]\nelevation_m = 2500\narea_km2 = 30\n[river_minimum]\nrate_m3s = 0\n";

fn outcome(place: &str, weather: &str) -> Outcome {
    read(Source::Embedded(&[("place.toml", place), ("weather.csv", weather)]))
}

fn errors(problems: &[Problem]) -> Vec<(&str, usize)> {
    let errors = problems.iter().filter(|problem| problem.severity == Severity::Error);
    errors.map(|problem| (problem.message, problem.at.line)).collect()
}

#[test]
fn the_least_place_takes_the_usual_values_of_its_hemisphere() {
    let outcome = outcome(&format!("{HEAD}{BAND}"), &weather(true, false));
    assert_eq!(errors(&outcome.problems), []);
    let place = outcome.place.unwrap();
    assert_eq!(place.valley.water_year_start_month, 4);
    assert_eq!(place.valley.survey, MonthDay { month: 10, day: 1 });
    assert_eq!(place.valley.spring_months, (10, 1));
    assert!(place.valley.is_southern() && place.valley.reservoir.is_none() && place.gates.is_empty());
    assert_eq!(place.notes.evaporation.choice, EvaporationChoice::HargreavesSamani);
    assert!(place.notes.evaporation.best_available);
    let open: Vec<Dial> = place.dials.open().map(|(dial, _)| dial).collect();
    assert_eq!(open, [Dial::Warming, Dial::WinterPrecipitation, Dial::SummerPrecipitation]);
    assert_eq!(place.dials.offer(Dial::TownGrowth), DialOffer::Lacking);
    assert!(!place.invented);
}

#[test]
fn a_record_of_means_alone_leaves_one_way_to_evaporation() {
    let means = HEAD
        .replace("temperature_min = { column = \"low\", unit = \"°C\" }\n", "")
        .replace("temperature_max = { column = \"high\"", "temperature_mean = { column = \"mean\"");
    let place = format!("{means}{BAND}");
    let read = outcome(&place, &weather(true, true));
    assert_eq!(errors(&read.problems), []);
    assert_eq!(read.place.unwrap().notes.evaporation.choice, EvaporationChoice::Oudin);
    let asked = format!("{place}[evaporation]\nmethod = \"hargreaves_samani\"\n");
    let read = outcome(&asked, &weather(true, true));
    assert_eq!(errors(&read.problems), [("problem-method-columns", asked.lines().count())]);
}

#[test]
fn a_curve_gives_bands_without_the_lake_and_the_fields() {
    let reservoir = "\n[reservoir]\ncapacity_hm3 = 10\noutlet_m3s = 5\nright = \"before_all\"\n[reservoir.table]\n\
                     level_m = [2000, 2020]\narea_km2 = [0, 1]\nvolume_hm3 = [0, 10]\n";
    let canal = "\n[[canal]]\nkey = \"c\"\nname = { en = \"C\", es = \"C\" }\ncapacity_m3s = 0.4\nopens = \"09-01\"\n\
                 closes = \"04-30\"\nturn_days = 7\n[[canal.field]]\ncrop = \"potato\"\narea_ha = 200\nmethod = \"drip\"\n";
    let curve = "\n[river_minimum]\nrate_m3s = 0\n[area_elevation]\nbands = 4\nelevation_m = [2000, 2400, 2800]\n\
                 area_below_km2 = [0, 8, 24]\nholds_fields = true\n";
    let text = format!("{HEAD}{reservoir}{canal}{curve}").replace("[station]", "area_km2 = 24\n[station]");
    let read = outcome(&text, &weather(true, false));
    assert_eq!(errors(&read.problems), []);
    let place = read.place.unwrap();
    let areas: Vec<f64> = place.valley.bands.iter().map(|band| band.area_km2).collect();
    // 4 + 4 + 8 + 8 km², less 1 of lake and 2 of fields from the bottom.
    assert_eq!(areas.len(), 4);
    for (area, expected) in areas.iter().zip([1.0, 4.0, 8.0, 8.0]) {
        approx::assert_relative_eq!(*area, expected, max_relative = 1e-12);
    }
    assert_eq!(place.valley.bands[1].elevation_m, 2300.0);
    let Purpose::Fields(fields) = &place.valley.gates[0].purpose else { panic!("the canal has a field") };
    let start = fields[0].crop.planting;
    assert!(start.month >= 8, "potatoes of the south start in spring: {start:?}");

    let acres = text
        .replace(
            "area_below_km2 = [0, 8, 24]",
            &format!("area_below_acres = [0, {}, {}]", 8.0e6 / M2_PER_ACRE, 24.0e6 / M2_PER_ACRE),
        )
        .replace(
            "[2000, 2400, 2800]",
            &format!("[{}, {}, {}]", 2000.0 / M_PER_FOOT, 2400.0 / M_PER_FOOT, 2800.0 / M_PER_FOOT),
        )
        .replace("bands = 4\nelevation_m", "bands = 4\nelevation_ft");
    let us = outcome(&acres, &weather(true, false)).place.unwrap();
    for (one, other) in us.valley.bands.iter().zip(&place.valley.bands) {
        approx::assert_relative_eq!(one.area_km2, other.area_km2, max_relative = 1e-12);
    }

    let small = text.replace("[0, 8, 24]", "[0, 1, 2.5]").replace("area_km2 = 24\n", "");
    let curve = small.lines().position(|line| line == "[area_elevation]").unwrap() + 1;
    assert_eq!(errors(&outcome(&small, &weather(true, false)).problems), [("problem-areas-inside", curve)]);
    let many = text.replace("bands = 4", "bands = 40");
    assert!(errors(&outcome(&many, &weather(true, false)).problems).contains(&("problem-too-many-bands", curve + 2)));
}

#[test]
fn the_record_knows_its_hemisphere() {
    let read = outcome(&format!("{HEAD}{BAND}"), &weather(false, false));
    assert_eq!(errors(&read.problems), [("problem-latitude-sign", 5)]);
}

#[test]
fn a_summer_season_over_new_year_is_legal() {
    let canal = |opens: &str, closes: &str, more: &str| {
        format!(
            "{HEAD}{BAND}[[canal]]\nkey = \"c\"\nname = {{ en = \"C\", es = \"C\" }}\ncapacity_m3s = 0.4\n\
             opens = \"{opens}\"\ncloses = \"{closes}\"\nturn_days = 7\n{more}\n[[canal.field]]\ncrop = \"potato\"\n\
             area_ha = 200\nmethod = \"drip\"\n"
        )
    };
    let told = |text: &str| {
        let problems = outcome(text, &weather(true, false)).problems;
        problems.iter().map(|problem| problem.message).collect::<Vec<_>>()
    };
    assert!(told(&canal("09-01", "04-30", "")).is_empty());
    assert_eq!(told(&canal("04-30", "09-01", "")), ["problem-season-winter"]);
    assert_eq!(told(&canal("05-01", "04-30", "")), [] as [&str; 0], "all year round from May");
    assert_eq!(told(&canal("09-01", "04-30", "season_over_new_year = false")), ["problem-season-backwards"]);
    assert_eq!(told(&canal("11-15", "01-10", "")), ["problem-season-backwards"]);
    assert!(told(&canal("11-15", "01-10", "season_over_new_year = true")).is_empty());
}

#[test]
fn an_empty_file_is_told_what_it_lacks() {
    let told = outcome("# nothing yet\n", "").problems;
    let missing: Vec<_> = told.iter().map(|problem| (problem.message, problem.at.line)).collect();
    assert_eq!(
        missing,
        [("problem-bands-missing", 0)].into_iter().chain([("problem-table-missing", 0); 4]).collect::<Vec<_>>()
    );
}
