//! Nothing lies over anything else and nothing is cut off: every page and card, every size, every language, extreme
//! scenes.

use deshielo::picture::Theme;
use deshielo::picture::views::facts::{AllYears, Skill, TestShown, TestedYears, Verdict, YearMeasure};
use deshielo::picture::views::term::{Explained, terms};
use deshielo::picture::views::{Scene, View, about, help};
use deshielo::session::help::key_lines;
use deshielo::water::calendar::Season;
use deshielo::water::dials::{Dial, Dials};
use deshielo::water::valley::{Purpose, Valley};
use deshielo::words::{KNOWN_TAGS, Words};
use embedded_graphics::geometry::Size;

use super::goldens::paint;
use super::scenes::{Land, Play, steep_valley};
use super::valleys::{canal, on, random_valley};
use super::{PAGES, TESTS, draw, draw_help, draw_term, facts, skill};

pub const SIZES: [(u16, u16); 7] =
    [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];

/// Draws everything of a scene in a language and gives the faults that were found.
fn faults(what: &str, scene: &Scene<'_>, words: &Words) -> Vec<String> {
    let mut found = Vec::new();
    let tag = words.tag();
    for view in PAGES {
        for (wide, high) in SIZES {
            let mut sheet = 0;
            loop {
                let open = Scene { sheet, ..*scene };
                let mut sheets = 1;
                let (_, strict) = paint(wide, high, |canvas| {
                    draw(view, canvas, &open, &Theme::LIGHT, words);
                    sheets = if view == View::About { about::sheet_count(canvas, &open, words) } else { 1 };
                });
                let at = format!("{what}, {} {sheet} in {tag} at {wide}x{high}", view.key());
                found.extend(strict.faults().iter().map(|fault| format!("{at}: {fault}")));
                sheet += 1;
                if sheet >= sheets {
                    break;
                }
            }
        }
    }
    found.extend(words.take_errors().iter().map(|error| format!("{what} in {tag}: {error:?}")));
    found
}

fn check(what: &str, land: &Land, play: Play<'_>, change: impl for<'s> Fn(Scene<'s>) -> Scene<'s>) {
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        land.show(Play { units: words.system(), ..play }, |scene| {
            found.extend(faults(what, &change(Scene { facts: facts(), ..*scene }), &words));
        });
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}

fn all_turned(share: f64) -> Dials {
    Dial::ALL.into_iter().fold(Dials::REST, |dials, dial| {
        let range = dial.widest();
        dials.with(dial, range.least + (range.most - range.least) * share)
    })
}

#[test]
fn at_the_ends_of_the_dials() {
    let land = Land::new(steep_valley(), 5, 1);
    check("all at least", &land, Play { dials: all_turned(0.0), ..Play::warm() }, |scene| scene);
    check("all at most", &land, Play { dials: all_turned(1.0), ..Play::warm() }, |scene| scene);
    check("at rest", &land, Play { dials: Dials::REST, ..Play::warm() }, |scene| scene);
}

#[test]
fn with_every_line_of_the_accounts() {
    let mut valley = steep_valley();
    valley.snow.sublimation_mm_day = 0.6;
    for gate in &mut valley.gates {
        gate.stored_loss_share = 0.2;
    }
    let land = Land::new(valley, 3, 3);
    check("every line", &land, Play { dials: all_turned(0.5), ..Play::warm() }, |scene| scene);
}

#[test]
fn with_no_water_and_no_works() {
    let dry = |mut valley: Valley| {
        valley.climb.precipitation_factor = 0.0;
        (valley.start.slow_mm, valley.start.quick_mm, valley.start.soil_share) = (0.0, 0.0, 0.0);
        valley.start.storage_share = 0.0;
        valley
    };
    let mut bare = steep_valley();
    (bare.reservoir, bare.minimum.rate_m3s) = (None, heapless::Vec::new());
    let mut empty = bare.clone();
    empty.gates.clear();
    check("no water", &Land::new(dry(steep_valley()), 3, 1), Play::warm(), |scene| scene);
    check("no reservoir", &Land::new(bare, 3, 2), Play::warm(), |scene| scene);
    check("no canals", &Land::new(empty.clone(), 3, 3), Play::warm(), |scene| scene);
    check("nothing at all", &Land::new(dry(empty), 3, 3), Play { dials: Dials::REST, ..Play::warm() }, |scene| scene);
}

#[test]
fn with_one_year_and_with_many() {
    check("one year", &Land::new(steep_valley(), 1, 5), Play { year: 0, ..Play::warm() }, |scene| scene);
    let long = Land::new(steep_valley(), 90, 6);
    check("ninety years", &long, Play { year: 45, ..Play::warm() }, |scene| scene);
    for measure in [YearMeasure::Snow, YearMeasure::Flow] {
        let land = Land::new(steep_valley(), 12, 6);
        check("another measure", &land, Play { year: 11, ..Play::warm() }, |scene| {
            let all_years = AllYears { measure, enough_share: 0.35, ..scene.all_years };
            Scene { all_years, ..scene }
        });
    }
}

#[test]
fn in_a_large_valley_with_a_long_name_in_the_south() {
    let mut south = steep_valley();
    (south.latitude_deg, south.water_year_start_month) = (-33.0, 4);
    for band in &mut south.bands {
        band.area_km2 *= 180.0;
    }
    for gate in &mut south.gates {
        if let Purpose::Fields(fields) = &mut gate.purpose {
            fields.iter_mut().for_each(|field| field.area_ha *= 180.0);
            gate.season = Season { from: on(9, 15), to: on(4, 20) };
        }
    }
    south.gates.push(canal(90_000.0, 1999, 6)).unwrap();
    let mut land = Land::new(south, 3, 8);
    land.place_name = "Valle de Nuestra Señora de la Candelaria de los Ñandúes y de las Aguas Frías".to_owned();
    check("a large valley", &land, Play { day: 250, ..Play::warm() }, |scene| {
        let source = "Hoja inventada de una oficina de riego que no existe, para probar cómo se parte un texto largo";
        let facts = deshielo::picture::views::facts::PlaceFacts { source: Some(source), ..scene.facts };
        Scene { facts, ..scene }
    });
}

#[test]
fn whatever_the_scores() {
    let land = Land::new(steep_valley(), 2, 8);
    let far = TestShown {
        years: TestedYears::Warmer,
        count: 21,
        judged: Some(-40.0),
        guess: Some(-55.0),
        verdict: Verdict::Fails,
    };
    let none = TestShown { judged: None, guess: None, ..far };
    let sets = [vec![], vec![far], vec![none], TESTS.to_vec(), vec![far, none, TESTS[1], TESTS[2]]];
    for tests in &sets {
        for bias in [None, Some(0.2), Some(-33.0)] {
            check("scores", &land, Play { fitted: true, ..Play::warm() }, |scene| Scene {
                // The scores outlive the scene only where they are constant.
                skill: Some(Skill { percent_bias: bias, tests: Vec::leak(tests.clone()), ..skill(&TESTS) }),
                ..scene
            });
        }
    }
    check("fitted, no scores", &land, Play { fitted: true, ..Play::warm() }, |scene| scene);
    check("not invented", &land, Play::warm(), |scene| Scene { invented: false, ..scene });
}

#[test]
fn said_in_two_languages_at_once() {
    let (spanish, _) = Words::new("es-US");
    let (english, _) = Words::new("en-US");
    let land = Land::new(steep_valley(), 3, 9);
    land.show(Play { second: Some(&spanish), ..Play::warm() }, |scene| {
        assert_eq!(faults("twice", scene, &english), [""; 0]);
    });
}

#[test]
fn in_places_at_random() {
    let (words, _) = Words::new("es-MX");
    for seed in 0..24 {
        let (valley, dials) = random_valley(seed);
        let land = Land::new(valley, 3, seed);
        land.show(Play { dials, year: 1, ..Play::warm() }, |scene| {
            assert_eq!(faults(&format!("place {seed}"), scene, &words), [""; 0]);
        });
    }
}

#[test]
fn every_sheet_of_the_help_card_and_every_explanation() {
    let land = Land::new(steep_valley(), 2, 9);
    let mut found: Vec<String> = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        land.show(Play { units: words.system(), dials: all_turned(1.0), ..Play::warm() }, |scene| {
            for (wide, high) in SIZES {
                for sheet in 0..help::sheet_count(Size::new(wide.into(), high.into()), &key_lines(), (&words, None)) {
                    let (_, strict) = paint(wide, high, |canvas| draw_help(canvas, sheet, &Theme::LIGHT, &words));
                    let at = format!("help {sheet} in {tag} at {wide}x{high}");
                    found.extend(strict.faults().iter().map(|fault| format!("{at}: {fault}")));
                }
                let terms = View::ALL.into_iter().flat_map(|view| terms(view)).map(|id| Explained::Term(id));
                for explained in terms.chain(scene.dials.iter().map(Explained::Dial)) {
                    let (_, strict) =
                        paint(wide, high, |canvas| draw_term(canvas, explained, scene, &Theme::LIGHT, &words));
                    let at = format!("{explained:?} in {tag} at {wide}x{high}");
                    found.extend(strict.faults().iter().map(|fault| format!("{at}: {fault}")));
                }
            }
        });
        found.extend(words.take_errors().iter().map(|error| format!("{tag}: {error:?}")));
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}
