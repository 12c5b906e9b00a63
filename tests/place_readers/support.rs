//! Files of the tests, and problems in short.

use deshielo::place::problem::Problem;
use deshielo::words::{Value, Words};

/// NetCDF classic by an independent library.
pub const STATION: &[u8] = include_bytes!("files/station.nc");
/// The same days in the 64-bit form, packed.
pub const STATION_64: &[u8] = include_bytes!("files/station64.nc");
/// WaterML 2.0 by hand.
pub const FLOW: &[u8] = include_bytes!("files/flow.xml");
/// GeoTIFF by an independent library.
pub const HEIGHTS_TIFF: &[u8] = include_bytes!("files/heights.tif");
/// The same heights as an Esri ASCII grid.
pub const HEIGHTS_ASCII: &[u8] = include_bytes!("files/heights.asc");
/// Their basin.
pub const BASIN: &[u8] = include_bytes!("files/basin.geojson");

/// Message and line of each problem, which both languages must be able to say.
pub fn told(problems: &[Problem]) -> Vec<(&'static str, usize)> {
    problems.iter().for_each(assert_sayable);
    problems.iter().map(|problem| (problem.message, problem.at.line)).collect()
}

/// Both languages have the message and its remedy, and nothing in them stays open.
pub fn assert_sayable(problem: &Problem) {
    use deshielo::place::problem::Argument;
    for tag in ["en", "es"] {
        let (words, _) = Words::new(tag);
        let arguments: Vec<(&str, Value<'_>)> = problem
            .arguments
            .iter()
            .map(|(name, argument)| {
                let value = match argument {
                    Argument::Text(text) => Value::from(text.as_str()),
                    Argument::Count(count) => Value::from(*count),
                    Argument::Number(number) => Value::Counted { number: *number, text: number.to_string().into() },
                    Argument::Date(date) => Value::from(date.to_string()),
                };
                (*name, value)
            })
            .collect();
        for id in [problem.message.to_owned(), format!("{}.remedy", problem.message)] {
            assert!(words.has(&id), "{tag}: {id}");
            words.say(&id, &arguments);
        }
        assert_eq!(words.take_errors(), [], "{tag} {}", problem.message);
    }
}
