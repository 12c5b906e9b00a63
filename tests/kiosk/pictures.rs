//! The stroll's line, the message of the day and the staff menu, compared with the pictures in `tests/golden`, and held
//! to nothing cut off and nothing over anything else in every language at every size.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test kiosk pictures` writes them anew; look at them before you commit them.

use deshielo::picture::views::scene::DialSetting;
use deshielo::picture::views::staff::{self, Body, Line, StaffCard};
use deshielo::picture::views::{Scene, canals, stroll, valley};
use deshielo::picture::{Canvas, Theme};
use deshielo::water::dials::Dial;
use deshielo::words::{KNOWN_TAGS, System, Words};

use super::goldens::{check, paint};
use super::scenes::{Land, Play, steep_valley};

const SIZES: [(u16, u16); 7] = [(240, 240), (240, 320), (320, 240), (480, 320), (800, 480), (1280, 720), (1920, 1080)];
const SAYS: [&str; 11] = [
    "stroll-hello",
    "stroll-year",
    "stroll-season",
    "stroll-warmer",
    "stroll-canals",
    "stroll-dry",
    "stroll-lining",
    "stroll-years",
    "stroll-trust",
    "stroll-caution",
    "kiosk-anyone-there",
];

fn line(id: &str, value: String, words: &Words) -> Line {
    Line { name: words.say(id, &[]), value }
}

/// The menu as it stands at the first start.
fn menu(words: &Words) -> Vec<Line> {
    let (yes, no) = (words.say("staff-yes", &[]), words.say("staff-no", &[]));
    let rows = [
        ("staff-close", String::new()),
        ("staff-health", String::new()),
        ("staff-tally", String::new()),
        ("staff-message", yes.clone()),
        ("staff-night", yes),
        ("staff-night-from", "21:00".to_owned()),
        ("staff-night-until", "7:00".to_owned()),
        ("staff-light", words.percent(100.0, 0)),
        ("staff-low-power", no.clone()),
        ("staff-clock", no),
        ("staff-forget-guesses", String::new()),
        ("staff-start-again", String::new()),
        ("staff-end", String::new()),
    ];
    rows.into_iter().map(|(id, value)| line(id, value, words)).collect()
}

/// Every fact with its longest value in that language.
fn facts(words: &Words) -> Vec<Line> {
    let longest = |id: &str, parts: &[&str]| {
        let values = parts.iter().map(|part| words.say(&format!("{id}.{part}"), &[]));
        line(id, values.max_by_key(|value| value.chars().count()).unwrap_or_default(), words)
    };
    vec![
        longest("staff-power", &["fine", "low", "was-low", "unknown"]),
        longest("staff-card", &["fine", "full", "read-only", "other", "damaged"]),
        longest("staff-wall-clock", &["missing", "year", "no-source", "unsteady"]),
        line("staff-running", "123:45 h".to_owned(), words),
        line("staff-version", "0.1.0".to_owned(), words),
    ]
}

fn uses(words: &Words) -> Vec<Line> {
    let ids = ["today", "week", "month", "all", "minutes"].map(|part| format!("staff-uses-{part}"));
    let mut lines: Vec<Line> = ids.iter().map(|id| line(id, words.number(12_345.0, 0), words)).collect();
    lines.push(line("staff-most-view", words.say("view-canals", &[]), words));
    lines.push(line("staff-most-dial", words.say("dial-winter-precipitation.short", &[]), words));
    lines
}

/// Draws a staff page by its name.
fn staff_page(canvas: &mut Canvas<'_>, page: &str, theme: &Theme, words: &Words) {
    let say = |id: &str| words.say(id, &[]);
    let (wait, none) = (words.say("staff-wait", &[("time", "59:58".into())]), say("staff-no-pin"));
    let (done, wrong) = (say("staff-pin-done"), say("staff-pin-wrong"));
    let list = |lines, at, in_hand| Body::List { lines, at, in_hand };
    let (menu, facts, uses) = (menu(words), facts(words), uses(words));
    let (title, body, foot) = match page {
        "none" => ("staff-title", Body::Text(&none), "staff-foot-page"),
        "wait" => ("staff-pin-title", Body::Text(&wait), "staff-foot-page"),
        "pin" => ("staff-pin-title", Body::Pin { digits: 3, wheel: "7", note: "" }, "staff-foot-pin"),
        "pin-wrong" => ("staff-pin-title", Body::Pin { digits: 0, wheel: &done, note: &wrong }, "staff-foot-pin"),
        "menu" => ("staff-title", list(&menu, Some(3), false), "staff-foot-menu"),
        "menu-value" => ("staff-title", list(&menu, Some(7), true), "staff-foot-value"),
        "menu-end" => ("staff-title", list(&menu, Some(12), false), "staff-foot-menu"),
        "health" => ("staff-health-title", list(&facts, None, false), "staff-foot-page"),
        _ => ("staff-tally-title", list(&uses, None, false), "staff-foot-page"),
    };
    staff::draw(canvas, &StaffCard { title: &say(title), body, foot: &say(foot) }, theme);
}

const PAGES: [&str; 9] = ["none", "wait", "pin", "pin-wrong", "menu", "menu-value", "menu-end", "health", "uses"];

/// Draws the page first and without a witness, as what lies over it does not count with it.
fn over(canvas: &mut Canvas<'_>, page: impl FnOnce(&mut Canvas<'_>), card: impl FnOnce(&mut Canvas<'_>)) {
    let size = canvas.frame().size;
    let mut under = vec![Theme::LIGHT.paper; (size.width * size.height) as usize];
    if let Ok(mut below) = Canvas::new(&mut under, size.width as u16, size.height as u16) {
        page(&mut below);
    }
    for (y, row) in under.chunks(size.width as usize).enumerate() {
        row.iter().enumerate().for_each(|(x, colour)| canvas.blend(x as i32, y as i32, *colour, 255));
    }
    card(canvas);
}

fn dial(scene: &Scene<'_>, dial: Dial, value: f64) -> DialSetting {
    let setting = scene.dials.iter().find(|setting| setting.dial == dial).unwrap();
    DialSetting { value: Some(value), ..*setting }
}

#[test]
fn what_lies_over_a_page_in_both_languages() {
    let land = Land::new(steep_valley(), 12, 11);
    for (tag, units) in [("en-US", System::Us), ("es-CL", System::Metric)] {
        let (words, _) = Words::new(tag);
        land.show(Play { units, year: 7, ..Play::warm() }, |scene| {
            for (wide, high) in [(320, 240), (800, 480)] {
                let on = |name: &str| format!("{name}-{tag}-{wide}x{high}");
                let theme = &Theme::LIGHT;
                check(&on("stroll-hello"), wide, high, |canvas| {
                    let says = words.say("stroll-hello", &[]);
                    over(
                        canvas,
                        |page| valley::draw(page, scene, theme, &words),
                        |canvas| {
                            stroll::draw(canvas, &says, None, theme, &words);
                        },
                    );
                });
                check(&on("stroll-lining"), wide, high, |canvas| {
                    let (says, turned) = (words.say("stroll-lining", &[]), dial(scene, Dial::CanalLining, 40.0));
                    over(
                        canvas,
                        |page| canals::draw(page, scene, theme, &words),
                        |canvas| {
                            stroll::draw(canvas, &says, Some((&turned, units)), theme, &words);
                        },
                    );
                });
                check(&on("stroll-message"), wide, high, |canvas| {
                    let text = if tag.starts_with("en") {
                        "Visit to the dam at ten o’clock. Meet at the door."
                    } else {
                        "Visita a la presa a las diez. Nos vemos en la puerta."
                    };
                    over(
                        canvas,
                        |page| valley::draw(page, scene, theme, &words),
                        |canvas| {
                            stroll::draw_message(canvas, text, theme, &words);
                        },
                    );
                });
                for page in ["pin", "menu", "menu-value", "health", "uses"] {
                    check(&on(&format!("staff-{page}")), wide, high, |canvas| staff_page(canvas, page, theme, &words));
                }
            }
        });
    }
}

#[test]
fn dark_and_narrow_screens_too() {
    let (words, _) = Words::new("es-US");
    for page in ["pin-wrong", "menu-end"] {
        check(&format!("staff-{page}-dark-240x240"), 240, 240, |canvas| staff_page(canvas, page, &Theme::DARK, &words));
        check(&format!("staff-{page}-240x320"), 240, 320, |canvas| staff_page(canvas, page, &Theme::LIGHT, &words));
    }
}

#[test]
fn nothing_is_cut_off_in_any_language_at_any_size() {
    let land = Land::new(steep_valley(), 2, 3);
    let mut found = Vec::new();
    for tag in KNOWN_TAGS {
        let (words, _) = Words::new(tag);
        land.show(Play { units: words.system(), ..Play::warm() }, |scene| {
            for (wide, high) in SIZES {
                let mut see = |what: &str, draw: &dyn Fn(&mut Canvas<'_>)| {
                    let (_, strict) = paint(wide, high, |canvas| draw(canvas));
                    found.extend(
                        strict.faults().iter().map(|fault| format!("{what} in {tag} at {wide}x{high}: {fault}")),
                    );
                };
                for says in SAYS {
                    let text = words.say(says, &[]);
                    see(says, &|canvas| stroll::draw(canvas, &text, None, &Theme::LIGHT, &words));
                    for turned in scene.dials {
                        see(says, &|canvas| {
                            stroll::draw(canvas, &text, Some((turned, words.system())), &Theme::LIGHT, &words);
                        });
                    }
                }
                let long = "Ñandú ".repeat(20);
                let word = "W".repeat(120);
                for text in ["¡Hola!", long.trim(), &word, ""] {
                    see("message", &|canvas| stroll::draw_message(canvas, text, &Theme::LIGHT, &words));
                }
                for page in PAGES {
                    see(page, &|canvas| staff_page(canvas, page, &Theme::LIGHT, &words));
                }
            }
        });
        found.extend(words.take_errors().iter().map(|error| format!("{tag}: {error:?}")));
    }
    assert!(found.is_empty(), "{} faults\n{}", found.len(), found[..found.len().min(40)].join("\n"));
}
