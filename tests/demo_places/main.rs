//! The invented places are what they are said to be: believable, sensible at every dial, and made again to the byte.

#[path = "../../examples/make_demo_data/records.rs"]
mod records;

mod others;
mod tresnubes;

use std::path::Path;

use deshielo::place::demo::{demo_files, droughts, piedranieve_files};
use deshielo::place::{DialPlan, Place, Source, Years, read, read_setting};
use deshielo::signs::{CanalSigns, Sign, YearReport, performance, read_run, spread};
use deshielo::water::basin::{Basin, BasinDay};
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::run::run_basin;
use deshielo::water::valley::Valley;
use deshielo::water::works::{Evening, Works};

/// Reads a place that must have nothing wrong with it, not even a warning.
fn place(source: Source<'_>) -> Place {
    let outcome = read(source);
    let told: Vec<_> =
        outcome.problems.iter().map(|problem| (problem.at.line, problem.message, &problem.arguments)).collect();
    assert!(told.is_empty(), "{told:?}");
    outcome.place.expect("a place without problems")
}

fn tresnubes() -> Place {
    place(Source::Embedded(demo_files()))
}

fn piedranieve() -> Place {
    place(Source::Embedded(piedranieve_files()))
}

fn limits() -> Place {
    place(Source::Folder(Path::new("demo-data/limits")))
}

/// The days of the basin and the whole water years.
fn run_telling(place: &Place, valley: &Valley, dials: &Dials, each: impl FnMut(&Evening)) -> Ran {
    let mut each = each;
    let mut basin = vec![BasinDay::default(); place.days.len()];
    let before = run_basin(valley, &Basin::new(valley, dials), &place.calendar, &place.days, &mut basin);
    let works = Works::new(valley, dials).expect("a checked place");
    let mut years = Vec::new();
    let each_day = |evening: &Evening, _: &_| each(evening);
    read_run(valley, &works, &place.calendar, &basin, &before, each_day, |year| years.push(year));
    Ran { basin, years }
}

fn run(place: &Place, dials: &Dials) -> Ran {
    run_telling(place, &place.valley, dials, |_| {})
}

struct Ran {
    basin: Vec<BasinDay>,
    years: Vec<YearReport>,
}

impl Ran {
    fn mean_of(&self, value: impl Fn(&YearReport) -> f64) -> f64 {
        self.years.iter().map(value).sum::<f64>() / self.years.len() as f64
    }

    fn mean(&self, sign: Sign) -> f64 {
        spread(self.years.iter().filter_map(|year| sign.of(&year.signs))).map_or(f64::NAN, |spread| spread.mean)
    }

    /// Mean natural flow of a year, hm³.
    fn flow_hm3(&self) -> f64 {
        self.mean_of(|year| year.signs.natural_flow_hm3)
    }

    fn canal(&self, place: &Place, key: &str, value: impl Fn(&CanalSigns) -> f64) -> f64 {
        let index = place.gates.iter().position(|gate| gate.key == key).expect("a gate of that name");
        self.mean_of(|year| value(&year.signs.canals[index]))
    }

    fn supply(&self, place: &Place, key: &str) -> f64 {
        self.canal(place, key, |canal| canal.supply_ratio.unwrap_or(1.0))
    }

    fn reliability(&self, place: &Place, key: &str) -> f64 {
        let index = place.gates.iter().position(|gate| gate.key == key).expect("a gate of that name");
        let years = self.years.iter().map(|year| &year.signs.canals[index]);
        let asked = years.map(|canal| (canal.demand_hm3, canal.delivered_hm3));
        performance(asked, place.valley.enough_share).expect("years with demand").reliability
    }
}

/// Every dial of the place at both of its ends.
fn dial_ends(plan: &DialPlan) -> Vec<(Dial, f64)> {
    plan.open().flat_map(|(dial, range)| [(dial, range.least), (dial, range.most)]).collect()
}

#[test]
fn every_record_is_made_again_byte_for_byte() {
    for record in records::RECORDS {
        let kept = std::fs::read_to_string(record.file).unwrap();
        assert!(record.text() == kept, "{}: run `cargo run --example make_demo_data`", record.file);
    }
    assert!(records::observed_text() == std::fs::read_to_string(records::OBSERVED_FILE).unwrap());
}

#[test]
fn every_file_says_on_top_that_it_is_invented_in_both_languages() {
    let mut seen = 0;
    for folder in ["tresnubes", "piedranieve", "limits"] {
        for entry in std::fs::read_dir(Path::new("demo-data").join(folder)).unwrap() {
            let path = entry.unwrap().path();
            let text = std::fs::read_to_string(&path).unwrap();
            let top: String = text.lines().take_while(|line| line.starts_with('#')).collect();
            let top = top.to_lowercase();
            assert!(top.contains("invented") && top.contains("inventado"), "{}", path.display());
            assert!(top.contains("made by") || top.contains("make_demo_data"), "{}: how?", path.display());
            seen += 1;
        }
    }
    assert_eq!(seen, 9);
    for place in [tresnubes(), piedranieve(), limits()] {
        assert!(place.invented && place.source.is_some());
    }
}

#[test]
fn what_is_built_in_is_what_lies_in_the_folder() {
    for (embedded, folder) in [(tresnubes(), "tresnubes"), (piedranieve(), "piedranieve")] {
        let folder = place(Source::Folder(&Path::new("demo-data").join(folder)));
        // NaN in a record is not equal to itself; the debug form is.
        assert_eq!(format!("{:?}", Place { folder: None, ..folder }), format!("{embedded:?}"));
    }
}

#[test]
fn the_ledger_closes_everywhere_at_rest_and_at_every_end() {
    for place in [tresnubes(), piedranieve(), limits()] {
        let ends = dial_ends(&place.dials);
        let settings = ends.iter().map(|&(dial, value)| Dials::REST.with(dial, value));
        for dials in settings.chain([Dials::REST]) {
            for year in run(&place, &dials).years {
                let residual = year.ledger.residual_share().abs();
                assert!(residual <= 1e-9, "{dials:?}, {}: {residual:e}", year.signs.water_year);
            }
        }
    }
}

#[test]
fn every_drought_is_one_wherever_it_can_be_tried() {
    assert_eq!(droughts().len(), 4);
    for (name, text) in droughts() {
        let file = format!("scenarios/droughts/{name}.toml");
        assert_eq!(*text, std::fs::read_to_string(&file).unwrap());
        let widest = read_setting(Path::new(&file), text, &DialPlan::WIDEST);
        assert!(widest.problems.is_empty(), "{:?}", widest.problems);
        let setting = widest.setting.unwrap();
        assert!(matches!(setting.years, Years::Dry | Years::Middling));
        for tag in ["en", "es", "es-CL", "es-ES"] {
            let sentence = setting.text.as_ref().unwrap().get(tag);
            assert!(sentence.ends_with('.') && setting.name.get(tag) != *name, "{tag}: {sentence}");
        }
        for place in [tresnubes(), piedranieve(), limits()] {
            let here = read_setting(Path::new(&file), text, &place.dials);
            assert!(here.problems.iter().all(|problem| problem.message == "problem-setting-dial-absent"));
            let (rest, dry) = (run(&place, &Dials::REST), run(&place, &here.setting.unwrap().dials));
            assert!(dry.mean(Sign::SupplyRatio) < rest.mean(Sign::SupplyRatio), "{name} at {}", place.name.get("en"));
        }
    }
}
