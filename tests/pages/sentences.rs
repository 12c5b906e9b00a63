//! What the pages say is what the numbers are: every sentence and every figure, over settings at random.

use deshielo::picture::Theme;
use deshielo::picture::views::facts::{AllYears, Skill, Verdict, YearMeasure};
use deshielo::picture::views::page_answer::{Enough, PageAnswer};
use deshielo::picture::views::{Scene, View};
use deshielo::signs::performance;
use deshielo::water::dials::Dials;
use deshielo::water::ledger::{Flow, Ledger, Store};
use deshielo::words::{Quantity, System, Unit, Words};

use super::goldens::paint;
use super::scenes::{Land, Play, steep_valley};
use super::valleys::random_valley;
use super::{TESTS, draw, skill};

fn english() -> Words {
    Words::new("en-US").0
}

/// Whole numbers in a text, without the marks of thousands.
fn numbers(text: &str) -> Vec<i64> {
    let text = text.replace(',', "");
    text.split(|letter: char| !letter.is_ascii_digit()).filter_map(|digits| digits.parse().ok()).collect()
}

fn ledgers(scene: &Scene<'_>) -> (Ledger, Ledger) {
    (scene.was.years[scene.was.chosen_year].ledger, scene.now.years[scene.now.chosen_year].ledger)
}

fn at_random(look: impl Fn(u32, &Scene<'_>)) {
    for seed in 0..40 {
        let (valley, dials) = random_valley(seed);
        let land = Land::new(valley, 4, seed + 100);
        land.show(Play { dials, year: (seed % 4) as usize, ..Play::warm() }, |scene| look(seed, scene));
    }
}

#[test]
fn the_ledger_says_what_the_river_brings() {
    let words = english();
    at_random(|seed, scene| {
        let (was, now) = ledgers(scene);
        let parts = |ledger: &Ledger| {
            libm::round(100.0 * ledger.of(Flow::NaturalInflow) / ledger.of(Flow::BasinPrecipitation)) as i64
        };
        let said = PageAnswer::ledger(scene).say(scene, &words);
        let mut expected = vec![100, parts(&now)];
        if scene.changed() {
            expected.push(parts(&was));
        }
        assert_eq!(numbers(&said), expected, "place {seed}: {said}");
    });
}

#[test]
fn the_ledger_page_writes_every_flow_and_its_two_sides_are_equal() {
    let words = english();
    let unit = Unit::CubicHectometres;
    at_random(|seed, scene| {
        let (_, now) = ledgers(scene);
        let (_, strict) = paint(1280, 720, |canvas| draw(View::Ledger, canvas, scene, &Theme::LIGHT, &words));
        let seen: Vec<&str> = strict.seen().iter().map(|seen| seen.text.as_str()).collect();
        let written = |value_m3: f64| words.significant(unit.convert(value_m3 / 1e6), 3);
        let flows = [
            ("ledger-precipitation", Flow::BasinPrecipitation),
            ("ledger-lake-rain", Flow::LakeRain),
            ("ledger-field-rain", Flow::FieldRain),
            ("ledger-evaporation", Flow::BasinEvaporation),
            ("ledger-sublimation", Flow::Sublimation),
            ("ledger-lake-evaporation", Flow::LakeEvaporation),
            ("ledger-crop-evaporation", Flow::FieldEvaporation),
            ("ledger-town-use", Flow::TownUse),
            ("ledger-deep-loss", Flow::DeepLoss),
            ("ledger-river-loss", Flow::RiverLoss),
            ("ledger-river-out", Flow::RiverOut),
        ];
        for (id, flow) in flows {
            if now.of(flow) > 1e-6 * now.in_m3() {
                let name = words.say(&format!("{id}.short"), &[]);
                assert!(seen.contains(&name.as_str()), "place {seed}: {name} is not there");
                let amount = written(now.of(flow));
                assert!(seen.contains(&amount.as_str()), "place {seed}: {name} is not {amount}");
            }
        }
        let gain_m3 = now.end.of(Store::Reservoir) - now.start.of(Store::Reservoir);
        if gain_m3.abs() > 1e-6 * now.in_m3() {
            let id = if gain_m3 > 0.0 { "page-into-reservoir" } else { "page-from-reservoir" };
            assert!(seen.contains(&words.say(id, &[]).as_str()), "place {seed}");
            assert!(seen.contains(&written(gain_m3.abs()).as_str()), "place {seed}");
        }
        let residual = words.say("page-ledger-residual", &[("amount", words.amount(0.0, unit, 3).into())]);
        assert!(seen.contains(&residual.as_str()), "place {seed}: {seen:?}");
        assert!(now.residual_share().abs() <= 1e-9);
    });
}

#[test]
fn a_year_without_rain_is_told_as_such() {
    let mut valley = steep_valley();
    valley.climb.precipitation_factor = 0.0;
    Land::new(valley, 3, 1).show(Play::warm(), |scene| {
        assert_eq!(PageAnswer::ledger(scene), PageAnswer::NothingFell);
    });
}

#[test]
fn all_years_counts_what_was_enough() {
    let words = english();
    let mut kinds = [0, 0, 0];
    at_random(|seed, scene| {
        let count = |years: &[deshielo::signs::YearReport]| {
            let asked = years.iter().filter_map(|year| year.signs.supply_ratio);
            let judged = performance(asked.map(|share| (1.0, share)), 0.9);
            judged.map_or((0, 0), |of| (libm::round(of.reliability * of.years as f64) as usize, of.years))
        };
        let ((now, of), (was, was_of)) = (count(scene.now.years), count(scene.was.years));
        let answer = PageAnswer::years(scene);
        if of == 0 && was_of == 0 {
            assert!(matches!(answer, PageAnswer::Mean { measure: YearMeasure::Flow, .. }), "place {seed}: {answer:?}");
            return;
        }
        let PageAnswer::Enough { now: told, before } = answer else { panic!("place {seed}: {answer:?}") };
        assert_eq!(told, Enough { years: now, of }, "place {seed}");
        assert_eq!(before, scene.changed().then_some(Enough { years: was, of: was_of }), "place {seed}");
        let said = answer.say(scene, &words);
        let numbers = numbers(&said).into_iter().map(|number| number as usize).collect::<Vec<_>>();
        match () {
            () if of == 0 => assert!(numbers.is_empty(), "{said}"),
            () if !scene.changed() => assert_eq!(numbers, [now, of], "{said}"),
            () if (now, of) == (was, was_of) => {
                assert!(said.contains("same as before"), "{said}");
                assert_eq!(numbers, [now, of], "{said}");
            }
            () if of == was_of => assert_eq!(numbers, [now, of, was], "{said}"),
            () => assert_eq!(numbers, [now, of, was, was_of], "{said}"),
        }
    });
    for (seed, share) in [(1, 0.2), (2, 0.75), (3, 1.0)] {
        Land::new(steep_valley(), 8, seed).show(Play::warm(), |scene| {
            let scene = Scene { all_years: AllYears { enough_share: share, ..scene.all_years }, ..*scene };
            let PageAnswer::Enough { now, .. } = PageAnswer::years(&scene) else { panic!() };
            let years = scene.now.years.iter().filter(|year| year.signs.supply_ratio.unwrap() >= share);
            assert_eq!(now, Enough { years: years.count(), of: 8 });
            kinds[usize::from(now.years > 0) + usize::from(now.years == 8)] += 1;
        });
    }
    assert!(kinds[0] > 0 && kinds[2] > 0, "the shares tell nothing apart: {kinds:?}");
}

#[test]
fn a_mean_year_is_the_mean_of_the_years() {
    let words = english();
    Land::new(steep_valley(), 7, 4).show(Play { units: System::Us, ..Play::warm() }, |scene| {
        let mean = |values: Vec<f64>| values.iter().sum::<f64>() / values.len() as f64;
        for (measure, quantity) in
            [(YearMeasure::Snow, Quantity::SnowWater), (YearMeasure::Flow, Quantity::StoredVolume)]
        {
            let scene = Scene { all_years: AllYears { measure, ..scene.all_years }, ..*scene };
            let of = |run: &deshielo::picture::views::scene::RunShown<'_>| {
                let signs = run.years.iter().map(|year| &year.signs);
                mean(match measure {
                    YearMeasure::Snow => signs.map(|signs| signs.peak_swe_mm).collect(),
                    _ => signs.map(|signs| signs.natural_flow_hm3).collect(),
                })
            };
            let said = PageAnswer::years(&scene).say(&scene, &words);
            for value in [of(&scene.now), of(&scene.was)] {
                let amount = words.quantity(value, quantity, System::Us, 3);
                assert!(said.contains(&amount), "{said} lacks {amount}");
            }
        }
    });
}

#[test]
fn a_short_year_is_marked_by_the_colour_of_lack_and_an_enough_one_is_not() {
    let words = english();
    for (share, lacks) in [(0.0, false), (1.1, true)] {
        Land::new(steep_valley(), 4, 4).show(Play { dials: Dials::REST, ..Play::warm() }, |scene| {
            let all_years = AllYears { enough_share: share, kinds: &[], ..scene.all_years };
            let scene = Scene { all_years, ..*scene };
            let (pixels, _) = paint(320, 240, |canvas| draw(View::Years, canvas, &scene, &Theme::LIGHT, &words));
            // The chart alone, without the legend, the chosen year's wedge and the dials.
            let chart = pixels.chunks(320).take(110).skip(55).flat_map(|row| &row[100..]);
            let found = chart.filter(|colour| **colour == Theme::LIGHT.lack).count();
            assert_eq!(found > 20, lacks, "{found} pixels at {share}");
        });
    }
}

#[test]
fn trust_says_what_is_known_and_no_more() {
    Land::new(steep_valley(), 2, 4).show(Play::warm(), |scene| {
        let shown = |fitted, invented, skill: Option<Skill<'static>>| {
            PageAnswer::trust(&Scene { fitted, invented, skill, ..*scene })
        };
        let tested = |tests| Some(skill(tests));
        assert_eq!(shown(false, true, None), PageAnswer::Invented);
        assert_eq!(shown(false, false, None), PageAnswer::NotFitted);
        // Scores of a fit that is not in use say nothing of what is on show.
        assert_eq!(shown(false, false, tested(&TESTS[..1])), PageAnswer::NotFitted);
        assert_eq!(shown(true, false, None), PageAnswer::Untested);
        assert_eq!(shown(true, false, tested(&[])), PageAnswer::Untested);
        assert_eq!(shown(true, true, tested(&TESTS[..2])), PageAnswer::Tested(Verdict::Holds));
        assert_eq!(shown(true, false, tested(&TESTS[..3])), PageAnswer::Tested(Verdict::Weakens));
        assert_eq!(shown(true, false, tested(&TESTS)), PageAnswer::Tested(Verdict::Fails));
    });
}

#[test]
fn about_tells_the_records_years_gaps_and_percent_per_degree() {
    let words = english();
    Land::new(steep_valley(), 9, 4).show(Play::warm(), |scene| {
        let scene = Scene { facts: super::facts(), ..*scene };
        let (_, strict) = paint(1920, 1080, |canvas| draw(View::About, canvas, &scene, &Theme::LIGHT, &words));
        let seen: Vec<&str> = strict.seen().iter().map(|seen| seen.text.as_str()).collect();
        let text = seen.join(" ");
        for part in ["9 water years, 1981 to 1989", "4 missing values", "3.1%", "1 °C", "at least 90%"] {
            let plain = |text: &str| text.replace(['\u{a0}', '\u{202f}', '\u{2009}'], " ");
            assert!(plain(&text).contains(part), "{part} is not in {text}");
        }
    });
}
