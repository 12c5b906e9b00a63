//! What a page says is what the signs hold: every sentence against the numbers, over random places and settings.

mod support {
    pub mod goldens;
    pub mod scenes;
    pub mod valleys;
}

use deshielo::picture::Theme;
use deshielo::picture::views::scene::{Doubt, Scene};
use deshielo::picture::views::{Answer, View};
use deshielo::signs::CanalSigns;
use deshielo::water::calendar::CalendarDay;
use deshielo::water::dials::Dials;
use deshielo::words::{DateStyle, Words};
use support::goldens::paint;
use support::scenes::{Land, PAGES, Play, draw, steep_valley};
use support::valleys::{numbers, random_valley};

/// A date as a sentence writes it, its parts held together.
fn date(day: CalendarDay, scene: &Scene<'_>, words: &Words) -> String {
    words.date(day.date(scene.year.start_month), DateStyle::InSentence).replace(' ', "\u{A0}")
}

fn days_between(was: CalendarDay, now: CalendarDay) -> i32 {
    i32::from(now.day_of_water_year) - i32::from(was.day_of_water_year)
}

/// The canals' signs as it was and now, in order of right, straight from the years.
fn canals<'s>(scene: &Scene<'s>) -> Vec<(&'s str, &'s CanalSigns, &'s CanalSigns)> {
    let of = |run: &deshielo::picture::views::scene::RunShown<'s>| &run.years[run.chosen_year].signs.canals;
    let (was, now) = (of(&scene.was), of(&scene.now));
    scene.canals.iter().map(|title| (title.name, &was[title.gate], &now[title.gate])).collect()
}

/// Checks a sentence for its parts, in English. `parts` must stand in it in that order.
fn assert_says(said: &str, parts: &[&str]) {
    let mut rest = said;
    for part in parts {
        let at = rest.find(part).unwrap_or_else(|| panic!("“{said}” does not say “{part}” where it should"));
        rest = &rest[at + part.len()..];
    }
}

fn counted(n: i32, one: &str, many: &str) -> String {
    format!("{n} {}", if n == 1 { one } else { many })
}

fn valley_says(scene: &Scene<'_>, said: &str, words: &Words) -> &'static str {
    if !scene.changed() {
        assert_eq!(said, "Nothing has changed yet. Turn one dial to begin.");
        return "nothing yet";
    }
    let lacking = |signs: &CanalSigns| i32::from(signs.days_short) + i32::from(signs.days_cut);
    let most = canals(scene).iter().map(|(_, was, now)| (lacking(now) - lacking(was)).abs()).max().unwrap_or(0);
    let (was, now) = (scene.was.signs().unwrap(), scene.now.signs().unwrap());
    if most > 0 {
        let fits = |(name, was, now): &(&str, &CanalSigns, &CanalSigns)| {
            let change = lacking(now) - lacking(was);
            let days = if change > 0 {
                counted(change, "more day", "more days")
            } else {
                counted(-change, "fewer day", "fewer days")
            };
            let before = counted(lacking(was), "day", "days");
            change.abs() == most && said == format!("{name} lacks water on {days}. Before: {before}.")
        };
        // Of canals with the same change, the youngest right.
        let canals = canals(scene);
        let speaker = canals.iter().rposition(|(_, was, now)| (lacking(now) - lacking(was)).abs() == most);
        assert!(speaker.is_some_and(|at| fits(&canals[at])), "{said}");
        return "lacking";
    }
    let percent = |ratio: Option<f64>| ratio.map(|ratio| (ratio * 100.0).round());
    if percent(was.supply_ratio) != percent(now.supply_ratio)
        && let (Some(before), Some(after)) = (was.supply_ratio, now.supply_ratio)
    {
        let shown = |ratio: f64| words.percent((ratio * 100.0).round(), 0);
        assert_says(said, &["Canals get ", &shown(after), "Before: ", &shown(before)]);
        return "supply";
    }
    let moved = |was: Option<CalendarDay>, now: Option<CalendarDay>, what: &str| {
        let (was, now) = (was?, now?);
        let days = days_between(was, now);
        (days != 0).then(|| {
            let count = counted(days.abs(), "day", "days");
            let way = if days < 0 { "sooner" } else { "later" };
            let dates = [date(now, scene, words), date(was, scene, words)];
            assert_says(said, &[what, &count, way, &dates[0], "Before: ", &dates[1]]);
        })
    };
    if moved(was.melt_out_date, now.melt_out_date, "The snow is gone ").is_some() {
        return "snow";
    }
    if moved(was.half_volume_date, now.half_volume_date, "Half of the year’s water is past ").is_some() {
        return "half";
    }
    assert_eq!(said, "The same days as before, for the canals and the snow.");
    "same"
}

fn season_says(scene: &Scene<'_>, said: &str, words: &Words) -> &'static str {
    let day = |run: &deshielo::picture::views::scene::RunShown<'_>| run.signs().unwrap().half_volume_date;
    match (day(&scene.was), day(&scene.now)) {
        (None, None) => {
            assert_eq!(said, "The river brings no water in this year.");
            "no water"
        }
        (None, Some(now)) => {
            assert_says(said, &["Now the river brings water", &date(now, scene, words), "Before: none."]);
            "water again"
        }
        (Some(was), None) => {
            assert_says(said, &["Now the river brings no water.", &date(was, scene, words)]);
            "water gone"
        }
        (Some(_), Some(now)) if !scene.changed() => {
            assert_eq!(said, format!("Half of the year’s water is past by {}.", date(now, scene, words)));
            "told"
        }
        (Some(was), Some(now)) if was == now => {
            assert_says(said, &["on the same day as before: ", &date(now, scene, words)]);
            "same day"
        }
        (Some(was), Some(now)) => {
            let days = days_between(was, now);
            let count = counted(days.abs(), "day", "days");
            let way = if days < 0 { "sooner" } else { "later" };
            let dates = [date(now, scene, words), date(was, scene, words)];
            assert_says(said, &["past ", &count, way, &dates[0], "Before: ", &dates[1]]);
            way
        }
    }
}

fn canals_says(scene: &Scene<'_>, said: &str, words: &Words) -> &'static str {
    let canals = canals(scene);
    if canals.is_empty() {
        assert_eq!(said, "This place has no canals.");
        return "no canals";
    }
    if canals.iter().all(|(_, was, now)| was.supply_ratio.is_none() && now.supply_ratio.is_none()) {
        assert_eq!(said, "In this year no canal asks for water.");
        return "nobody asks";
    }
    if !scene.changed() {
        let firsts = canals.iter().filter_map(|(name, _, now)| Some((now.first_short_date?, *name)));
        return match firsts.min_by_key(|(day, _)| day.day_of_water_year) {
            None => {
                assert_eq!(said, "In this year every canal gets all its water.");
                "all full"
            }
            Some((day, name)) => {
                let day = date(day, scene, words);
                assert_eq!(said, format!("{name} is the first to lack water, from {day} on."));
                "first short"
            }
        };
    }
    let gone_or_come =
        canals.iter().filter(|(_, was, now)| was.last_full_date.is_some() != now.last_full_date.is_some());
    if let Some((name, was, now)) = gone_or_come.last() {
        return match (was.last_full_date, now.last_full_date) {
            (Some(was), _) => {
                assert_says(said, &[name, " has no full day now. Before, the last one was ", &date(was, scene, words)]);
                "lost"
            }
            (_, now) => {
                assert_says(said, &[name, " now has full days, the last on ", &date(now.unwrap(), scene, words)]);
                "gained"
            }
        };
    }
    let shifts = canals.iter().filter_map(|(name, was, now)| Some((*name, was.last_full_date?, now.last_full_date?)));
    let most = shifts.clone().map(|(_, was, now)| days_between(was, now).abs()).max().unwrap_or(0);
    if most == 0 {
        assert_eq!(said, "Every canal has the same last full day as before.");
        return "same";
    }
    let (name, was, now) = shifts.filter(|(_, was, now)| days_between(*was, *now).abs() == most).last().unwrap();
    let days = days_between(was, now);
    let way = if days < 0 { "sooner" } else { "later" };
    let dates = [date(now, scene, words), date(was, scene, words)];
    let count = counted(most, "day", "days");
    assert_says(said, &[name, " has its last full day ", &count, way, &dates[0], "Before: ", &dates[1]]);
    way
}

fn answer(view: View, scene: &Scene<'_>) -> Answer {
    match view {
        View::Valley => Answer::valley(scene),
        View::Season => Answer::season(scene),
        _ => Answer::canals(scene),
    }
}

/// The sentence as it was drawn: the first pieces of text of the page, put together again.
fn headline(view: View, scene: &Scene<'_>, words: &Words) -> String {
    let (_, strict) = paint(800, 480, |canvas| draw(view, canvas, scene, &Theme::LIGHT, words));
    let said = answer(view, scene).say(scene, words);
    let mut drawn = String::new();
    for seen in strict.seen() {
        if drawn.len() >= said.len() {
            break;
        }
        if !drawn.is_empty() {
            drawn.push(' ');
        }
        drawn.push_str(&seen.text);
    }
    drawn
}

#[test]
fn every_sentence_is_true_of_the_signs() {
    let (words, _) = Words::new("en-US");
    let mut heard = std::collections::BTreeMap::new();
    for seed in 0..240u32 {
        let (valley, turned) = random_valley(seed);
        let mut next = numbers(seed ^ 0x5eed);
        let mut valley = valley;
        if seed % 16 == 3 {
            valley.climb.precipitation_factor = 0.0;
            (valley.start.quick_mm, valley.start.slow_mm, valley.start.soil_share) = (0.0, 0.0, 0.0);
        }
        let dials = match seed % 5 {
            0 => Dials::REST,
            1 => Dials::REST.with(deshielo::water::dials::Dial::TownGrowth, 10.0),
            _ => turned,
        };
        let land = Land::new(valley, 3, seed);
        let play = Play { dials, year: (next() * 2.99) as usize, day: (next() * 364.0) as usize, ..Play::warm() };
        land.show(play, |scene| {
            for view in PAGES {
                let said = headline(view, scene, &words);
                let kind = match view {
                    View::Valley => valley_says(scene, &said, &words),
                    View::Season => season_says(scene, &said, &words),
                    _ => canals_says(scene, &said, &words),
                };
                *heard.entry((view.key(), kind)).or_insert(0) += 1;
            }
        });
    }
    assert_eq!(words.take_errors(), []);
    println!("{heard:?}");
    let kinds = |view: &str| heard.keys().filter(|(key, _)| *key == view).count();
    assert!(kinds("valley") >= 5 && kinds("season") >= 4 && kinds("canals") >= 7, "{heard:?}");
}

#[test]
fn a_range_that_holds_zero_is_no_clear_change() {
    let land = Land::new(steep_valley(), 3, 1);
    for tag in ["en-US", "es-MX"] {
        let (words, _) = Words::new(tag);
        land.show(Play::warm(), |scene| {
            let with = |low, high| {
                let lacking_days = &[(low, high); 5];
                let last_full_days = &[Some((low, high)); 5];
                let half_volume_days = Some((low, high));
                let doubt = Doubt { half_volume_days, lacking_days, last_full_days, ..Doubt::default() };
                let scene = Scene { doubt: Some(doubt), ..*scene };
                PAGES.map(|view| answer(view, &scene).say(&scene, &words))
            };
            let unclear = words.say("change-unclear", &[]);
            assert_eq!(with(-3, 2), [unclear.clone(), unclear.clone(), unclear.clone()]);
            assert_eq!(with(0, 4)[1], unclear);
            let clear = with(-25, -18);
            assert!(clear.iter().all(|said| *said != unclear), "{clear:?}");
            assert!(clear[1].contains(&words.days_range(-25, -18)), "{clear:?}");
            assert!(clear[2].contains(&words.days_range(-25, -18)), "{clear:?}");
        });
    }
}

#[test]
fn every_sentence_is_said_in_every_language() {
    for tag in deshielo::words::KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        for seed in 0..24u32 {
            let (valley, dials) = random_valley(seed);
            let land = Land::new(valley, 3, seed);
            land.show(Play { dials: if seed % 4 == 0 { Dials::REST } else { dials }, ..Play::warm() }, |scene| {
                for view in PAGES {
                    let said = answer(view, scene).say(scene, &words);
                    assert!(said.ends_with('.') && !said.contains('{'), "{tag}: {said}");
                }
            });
        }
        assert_eq!(words.take_errors(), [], "{tag}");
    }
}
