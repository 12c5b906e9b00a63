//! The invented weather of the demo places: which recipe, which days, which seed, and how it is written.
//!
//! `tests/demo_places/` makes every file anew and compares it byte for byte with the one that is kept.

use chrono::{Datelike, NaiveDate};
use deshielo::generator::{GeneratorDay, Recipe, generate, invented};

/// A weather record of a demo place.
pub struct DemoRecord {
    /// Where it is kept, from the root of the repository.
    pub file: &'static str,
    /// Name of the recipe in [`invented`].
    recipe_name: &'static str,
    recipe: fn() -> Recipe,
    /// Water years, named for the calendar year in which they end.
    water_years: (i32, i32),
    seed: u64,
    /// Whether humidity, wind and solar radiation are written as well.
    with_air: bool,
}

/// Every weather record of the demo places.
pub const RECORDS: [DemoRecord; 3] = [
    DemoRecord {
        file: "demo-data/tresnubes/weather.csv",
        recipe_name: "tresnubes",
        recipe: invented::tresnubes,
        water_years: (1980, 2020),
        seed: 7,
        with_air: false,
    },
    DemoRecord {
        file: "demo-data/piedranieve/weather.csv",
        recipe_name: "valle_del_sur",
        recipe: invented::valle_del_sur,
        water_years: (1996, 2020),
        seed: 11,
        with_air: false,
    },
    DemoRecord {
        file: "demo-data/limits/weather.csv",
        recipe_name: "tresnubes",
        recipe: invented::tresnubes,
        water_years: (2001, 2003),
        seed: 24,
        with_air: true,
    },
];

impl DemoRecord {
    /// The days of the record.
    pub fn days(&self) -> Vec<GeneratorDay> {
        let recipe = (self.recipe)();
        let month = recipe.water_year_start_month;
        let first_of = |year| NaiveDate::from_ymd_opt(year, month, 1).expect("a first of a month");
        let start = first_of(self.water_years.0 - 1);
        let days = (first_of(self.water_years.1) - start).num_days() as usize;
        generate(&recipe, start, days, self.seed).expect("an invented recipe is sound")
    }

    /// The whole file.
    pub fn text(&self) -> String {
        let days = self.days();
        let (first, count) = (days[0].date, days.len());
        let air = if self.with_air { ",humidity_percent,wind_m_s,solar_mj_m2" } else { "" };
        let mut text = format!(
            "# Invented weather: no such valley exists, and no station stands behind these numbers.\n\
             # Tiempo inventado: este valle no existe, y ninguna estación midió estos números.\n\
             # Made by `cargo run --example make_demo_data`: recipe {}, from {first}, {count} days, seed {}.\n\
             date,tmin_c,tmax_c,precipitation_mm{air}\n",
            self.recipe_name, self.seed
        );
        for day in &days {
            let (year, month, date) = (day.date.year(), day.date.month(), day.date.day());
            let [tmin, tmax, depth] = [day.tmin_c, day.tmax_c, day.precipitation_mm].map(one_decimal);
            text.push_str(&format!("{year}-{month:02}-{date:02},{tmin},{tmax},{depth}"));
            if let (true, Some(humidity), Some(wind), Some(solar)) =
                (self.with_air, day.relative_humidity_percent, day.wind_2m_ms, day.solar_mj_m2)
            {
                text.push_str(&format!(",{humidity:.0},{wind:.1},{solar:.1}"));
            }
            text.push('\n');
        }
        text
    }
}

/// One decimal; a dry day and a day of no degrees are a bare 0, which keeps the file small.
fn one_decimal(value: f64) -> String {
    let written = format!("{value:.1}");
    if matches!(written.as_str(), "0.0" | "-0.0") { "0".to_owned() } else { written }
}

/// What was never observed in the place for tests only: flow, snow, storage and one canal, as an office would send it,
/// with decimal commas and days before months. Straight lines through the year, and every fiftieth flow missing.
pub const OBSERVED_FILE: &str = "demo-data/limits/observed.csv";

/// The text of [`OBSERVED_FILE`].
pub fn observed_text() -> String {
    let mut text = String::from(
        "# Invented: observations of a place for tests only. Inventado, solo para pruebas.\n\
         # Made by `cargo run --example make_demo_data`: straight lines through the year.\n\
         fecha;caudal_pcs;agua_de_nieve_in;almacenamiento_acre_pies;canal_2_l_s\n",
    );
    let rise_and_fall = |day: f64, peak: f64, before: f64, after: f64| {
        let away = if day < peak { (peak - day) / before } else { (day - peak) / after };
        if away < 1.0 { 1.0 - away } else { 0.0 }
    };
    for (index, day) in RECORDS[2].days().iter().enumerate() {
        let of_year = f64::from((day.date.ordinal0() + 92) % 366);
        let flow_cfs = 30.0 + 900.0 * rise_and_fall(of_year, 232.0, 60.0, 75.0);
        let snow_in = 14.0 * rise_and_fall(of_year, 183.0, 150.0, 70.0);
        let storage_acre_feet = 20_000.0 + 30_000.0 * rise_and_fall(of_year, 255.0, 120.0, 110.0);
        let canal_l_s = 400.0 * rise_and_fall(of_year, 280.0, 80.0, 90.0);
        let flow = if index % 50 == 49 { "M".to_owned() } else { format!("{flow_cfs:.1}") };
        let row = format!("{flow};{snow_in:.1};{storage_acre_feet:.0};{canal_l_s:.0}").replace('.', ",");
        text.push_str(&format!("{};{row}\n", day.date.format("%d/%m/%Y")));
    }
    text
}
