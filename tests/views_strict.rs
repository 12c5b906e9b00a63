//! Nothing lies over anything else and nothing is cut off: every page, every size, every language, extreme scenes.

mod support {
    pub mod goldens;
    pub mod scenes;
    pub mod valleys;
}

use deshielo::picture::Theme;
use deshielo::picture::views::scene::YearKind;
use deshielo::water::calendar::Season;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::valley::Valley;
use deshielo::words::{KNOWN_TAGS, System, Words};
use support::goldens::paint;
use support::scenes::{Land, PAGES, Play, draw, steep_valley};
use support::valleys::{canal, on, town};

const SIZES: [(u16, u16); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];

/// Draws everything in every language and gives the faults that were found.
fn faults(what: &str, land: &Land, play: Play<'_>) -> Vec<String> {
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        let units = words.system();
        land.show(Play { units, ..play }, |scene| {
            for view in PAGES {
                for (wide, high) in SIZES {
                    let (_, strict) = paint(wide, high, |canvas| draw(view, canvas, scene, &Theme::LIGHT, &words));
                    let at = format!("{what}, {} in {tag} at {wide}x{high}", view.key());
                    found.extend(strict.faults().iter().map(|fault| format!("{at}: {fault}")));
                }
            }
        });
        found.extend(words.take_errors().iter().map(|error| format!("{what} in {tag}: {error:?}")));
    }
    found
}

fn all_turned(share: f64) -> Dials {
    Dial::ALL.into_iter().fold(Dials::REST, |dials, dial| {
        let range = dial.widest();
        dials.with(dial, range.least + (range.most - range.least) * share)
    })
}

fn without_water(mut valley: Valley) -> Valley {
    valley.climb.precipitation_factor = 0.0;
    valley.start.slow_mm = 0.0;
    valley.start.quick_mm = 0.0;
    valley.start.soil_share = 0.0;
    valley.start.storage_share = 0.0;
    valley
}

fn check(scenes: &[(&str, Land, Play<'_>)]) {
    let found: Vec<String> = scenes.iter().flat_map(|(what, land, play)| faults(what, land, *play)).collect();
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(60)].join("\n"));
}

#[test]
fn at_the_ends_of_the_dials() {
    let warm = Play::warm();
    check(&[
        ("all at least", Land::new(steep_valley(), 3, 1), Play { dials: all_turned(0.0), day: 0, ..warm }),
        ("all at most", Land::new(steep_valley(), 3, 2), Play { dials: all_turned(1.0), day: 364, ..warm }),
        ("at rest", Land::new(steep_valley(), 3, 3), Play { dials: Dials::REST, ..warm }),
        ("kept beside", Land::new(steep_valley(), 3, 4), Play { beside: Some(all_turned(0.4)), fitted: true, ..warm }),
    ]);
}

#[test]
fn with_no_water_and_no_works() {
    let warm = Play::warm();
    let mut bare = steep_valley();
    (bare.reservoir, bare.minimum.rate_m3s) = (None, heapless::Vec::new());
    let mut empty = bare.clone();
    empty.gates.clear();
    let mut snowless = steep_valley();
    snowless.rain_snow.all_snow_below_c = -90.0;
    snowless.rain_snow.all_rain_above_c = -80.0;
    check(&[
        ("no water at all", Land::new(without_water(steep_valley()), 3, 1), warm),
        ("no water, at rest", Land::new(without_water(steep_valley()), 3, 1), Play { dials: Dials::REST, ..warm }),
        ("no reservoir", Land::new(bare, 3, 2), warm),
        ("no reservoir and no canals", Land::new(empty, 3, 3), Play { kind: YearKind::Any, ..warm }),
        ("no snow", Land::new(snowless, 3, 4), Play { day: 120, ..warm }),
    ]);
}

#[test]
fn with_many_canals_and_long_names() {
    let warm = Play { day: 290, ..Play::warm() };
    let mut crowd = steep_valley();
    crowd.gates.clear();
    for index in 0..24 {
        let gate = if index % 7 == 3 {
            town(900.0, 1870 + index, 25)
        } else {
            canal(400.0 + 20.0 * f64::from(index), 1990 - 4 * index, (index + 2) as u8)
        };
        crowd.gates.push(gate).unwrap();
    }
    let crowd = Land::new(crowd, 3, 5);
    let mut long = Land::new(steep_valley(), 3, 6);
    long.place_name = "Valle de Nuestra Señora de la Candelaria de los Ñandúes y de las Aguas Frías".to_owned();
    for name in &mut long.names {
        *name = format!("Canal Unificado de {name} Ángeles y Ñuñoa de Arriba");
    }
    let mut single = steep_valley();
    single.bands.truncate(1);
    single.gates.truncate(1);
    check(&[
        ("24 canals", crowd, warm),
        ("long names", long, warm),
        ("one band, one canal", Land::new(single, 3, 7), warm),
    ]);
}

#[test]
fn in_the_south_from_april_on() {
    let mut south = steep_valley();
    south.latitude_deg = -33.0;
    south.water_year_start_month = 4;
    for gate in &mut south.gates {
        if !gate.is_town() {
            gate.season = Season { from: on(9, 15), to: on(4, 20) };
        }
    }
    check(&[("the south", Land::new(south, 3, 8), Play { day: 250, ..Play::warm() })]);
}

#[test]
fn said_in_two_languages_at_once() {
    let (spanish, _) = Words::new("es-US");
    let land = Land::new(steep_valley(), 3, 9);
    let (english, _) = Words::new("en-US");
    land.show(Play { second: Some(&spanish), units: System::Us, ..Play::warm() }, |scene| {
        for view in PAGES {
            for (wide, high) in SIZES {
                let (_, strict) = paint(wide, high, |canvas| draw(view, canvas, scene, &Theme::LIGHT, &english));
                strict.assert_clean(&format!("{} twice at {wide}x{high}", view.key()));
            }
        }
    });
}
