//! The valley, season and canals pages, compared pixel by pixel with the pictures in `tests/golden`.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test views_goldens` writes the pictures anew; look at them before you commit
//! them.

mod support {
    pub mod goldens;
    pub mod scenes;
    pub mod valleys;
}

use deshielo::picture::Theme;
use deshielo::picture::views::View;
use deshielo::words::{System, Words};
use support::goldens::check;
use support::scenes::{Land, PAGES, Play, draw, steep_valley};

fn land() -> Land {
    Land::new(steep_valley(), 6, 7)
}

fn name(view: View, what: &str) -> String {
    format!("view-{}-{what}", view.key())
}

#[test]
fn every_page_in_both_languages() {
    // A day of melt in one language, a day of lack in the other.
    for (tag, units, day) in [("en-US", System::Us, 216), ("es-CL", System::Metric, 290)] {
        let (words, _) = Words::new(tag);
        land().show(Play { units, day, ..Play::warm() }, |scene| {
            for view in PAGES {
                for (wide, high) in [(320, 240), (800, 480)] {
                    let name = name(view, &format!("{tag}-{wide}x{high}"));
                    check(&name, wide, high, |canvas| draw(view, canvas, scene, &Theme::LIGHT, &words));
                }
            }
        });
    }
}

#[test]
fn every_page_at_night_and_in_the_sun() {
    let (words, _) = Words::new("es-US");
    land().show(Play { playing: true, ..Play::warm() }, |scene| {
        for view in PAGES {
            let dark = name(view, "dark-320x240");
            check(&dark, 320, 240, |canvas| draw(view, canvas, scene, &Theme::DARK, &words));
            let sun = name(view, "sunlight-320x240");
            check(&sun, 320, 240, |canvas| draw(view, canvas, scene, &Theme::SUNLIGHT, &words));
        }
    });
}

#[test]
fn every_page_at_the_other_sizes() {
    let (words, _) = Words::new("en-GB");
    land().show(Play::warm(), |scene| {
        for view in PAGES {
            for (wide, high) in [(240, 240), (240, 320), (480, 320), (1280, 720), (1920, 1080)] {
                let name = name(view, &format!("en-GB-{wide}x{high}"));
                check(&name, wide, high, |canvas| draw(view, canvas, scene, &Theme::LIGHT, &words));
            }
        }
    });
}
