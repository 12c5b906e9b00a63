//! Every page and card compared pixel by pixel with the pictures in `tests/golden`.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test pages` writes them anew; look at them before you commit them.

use deshielo::picture::views::facts::YearMeasure;
use deshielo::picture::views::term::Explained;
use deshielo::picture::views::{Scene, View, valley};
use deshielo::picture::{Canvas, Theme};
use deshielo::water::valley::Purpose;
use deshielo::words::{System, Words};

use super::goldens::check;
use super::scenes::{Land, Play, steep_valley};
use super::{PAGES, TESTS, draw, draw_help, draw_term, facts, skill};

const SIZES: [(u16, u16); 2] = [(320, 240), (800, 480)];

fn land() -> Land {
    let mut valley = steep_valley();
    for gate in &mut valley.gates {
        if let Purpose::Fields(fields) = &mut gate.purpose {
            fields.iter_mut().for_each(|field| field.area_ha *= 0.72);
        }
    }
    Land::new(valley, 20, 11)
}

/// A dry year of that land.
fn dry() -> Play<'static> {
    Play { year: 7, ..Play::warm() }
}

/// Draws the valley first and without a witness, as a card lies over whatever is open.
pub fn over(canvas: &mut Canvas<'_>, scene: &Scene<'_>, words: &Words, card: impl FnOnce(&mut Canvas<'_>)) {
    let size = canvas.frame().size;
    let mut under = vec![Theme::LIGHT.paper; (size.width * size.height) as usize];
    if let Ok(mut below) = Canvas::new(&mut under, size.width as u16, size.height as u16) {
        valley::draw(&mut below, scene, &Theme::LIGHT, words);
    }
    let colours = under.chunks(size.width as usize).enumerate();
    for (y, row) in colours {
        for (x, colour) in row.iter().enumerate() {
            canvas.blend(x as i32, y as i32, *colour, 255);
        }
    }
    card(canvas);
}

#[test]
fn every_page_in_both_languages() {
    for (tag, units) in [("en-US", System::Us), ("es-CL", System::Metric)] {
        let (words, _) = Words::new(tag);
        land().show(Play { units, ..dry() }, |scene| {
            let scene = Scene { facts: facts(), ..*scene };
            for view in PAGES {
                for (wide, high) in SIZES {
                    let name = format!("page-{}-{tag}-{wide}x{high}", view.key());
                    check(&name, wide, high, |canvas| draw(view, canvas, &scene, &Theme::LIGHT, &words));
                }
            }
            let fitted = Scene { fitted: true, skill: Some(skill(&TESTS)), ..scene };
            for (wide, high) in SIZES {
                let name = format!("page-trust-fitted-{tag}-{wide}x{high}");
                check(&name, wide, high, |canvas| draw(View::Trust, canvas, &fitted, &Theme::LIGHT, &words));
                let second = Scene { sheet: 1, ..scene };
                let name = format!("page-about-second-{tag}-{wide}x{high}");
                check(&name, wide, high, |canvas| draw(View::About, canvas, &second, &Theme::LIGHT, &words));
            }
        });
    }
}

#[test]
fn every_card_in_both_languages() {
    for (tag, units) in [("en-US", System::Us), ("es-CL", System::Metric)] {
        let (words, _) = Words::new(tag);
        land().show(Play { units, ..dry() }, |scene| {
            for (wide, high) in SIZES {
                for sheet in 0..3 {
                    let name = format!("card-help-{sheet}-{tag}-{wide}x{high}");
                    check(&name, wide, high, |canvas| {
                        over(canvas, scene, &words, |canvas| draw_help(canvas, sheet, &Theme::LIGHT, &words));
                    });
                }
                let explained = [
                    ("term", Explained::Term("term-snow-water")),
                    ("caution", Explained::Term("caution-canals-kill")),
                    ("dial", Explained::Dial(&scene.dials[0])),
                ];
                for (what, explained) in explained {
                    let name = format!("card-{what}-{tag}-{wide}x{high}");
                    check(&name, wide, high, |canvas| {
                        over(canvas, scene, &words, |canvas| {
                            draw_term(canvas, explained, scene, &Theme::LIGHT, &words)
                        });
                    });
                }
            }
        });
    }
}

#[test]
fn at_night_in_the_sun_and_at_rest() {
    let (words, _) = Words::new("es-US");
    let themes = [("dark", Theme::DARK), ("sunlight", Theme::SUNLIGHT)];
    land().show(Play { fitted: true, ..dry() }, |scene| {
        let scene = Scene { facts: facts(), skill: Some(skill(&TESTS)), ..*scene };
        for view in PAGES {
            for (name, theme) in &themes {
                let name = format!("page-{}-{name}-320x240", view.key());
                check(&name, 320, 240, |canvas| draw(view, canvas, &scene, theme, &words));
            }
        }
    });
    land().show(Play { dials: deshielo::water::dials::Dials::REST, ..dry() }, |scene| {
        let all_years = deshielo::picture::views::facts::AllYears { measure: YearMeasure::Snow, ..scene.all_years };
        let scene = Scene { all_years, ..*scene };
        for view in [View::Ledger, View::Years] {
            let name = format!("page-{}-at-rest-320x240", view.key());
            check(&name, 320, 240, |canvas| draw(view, canvas, &scene, &Theme::LIGHT, &words));
        }
    });
}

#[test]
fn at_the_other_sizes() {
    let (words, _) = Words::new("en-GB");
    land().show(dry(), |scene| {
        let scene = Scene { facts: facts(), ..*scene };
        for view in PAGES {
            for (wide, high) in [(240, 240), (240, 320), (480, 320), (1920, 1080)] {
                let name = format!("page-{}-en-GB-{wide}x{high}", view.key());
                check(&name, wide, high, |canvas| draw(view, canvas, &scene, &Theme::LIGHT, &words));
            }
        }
    });
}
