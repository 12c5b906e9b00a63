//! The pages beside the year, and the cards that lie over a page: their pictures, their room, their sentences.

#[path = "../support/goldens.rs"]
mod goldens;
#[path = "../support/scenes.rs"]
mod scenes;
#[path = "../support/valleys.rs"]
mod valleys;

mod pictures;
mod ring;
mod room;
mod sentences;
mod sheets;

use deshielo::picture::views::facts::{PlaceFacts, Skill, TestShown, TestedYears, Verdict};
use deshielo::picture::views::term::Explained;
use deshielo::picture::views::{Scene, View, about, help, ledger, many_years, term, trust};
use deshielo::picture::{Canvas, Theme};
use deshielo::session::help::key_lines;
use deshielo::words::Words;

/// The pages of this test.
pub const PAGES: [View; 4] = [View::Ledger, View::Years, View::Trust, View::About];

/// What is told of the place of these tests.
pub fn facts() -> PlaceFacts<'static> {
    PlaceFacts {
        source: None,
        evaporation_key: Some("hargreaves_samani"),
        percent_per_degree: Some(3.1),
        rule_key: Some("seniority"),
        filled_values: Some(4),
        ..PlaceFacts::default()
    }
}

/// Tests as a fit may leave them: some hold, one weakens, one fails.
pub const TESTS: [TestShown; 4] = [
    TestShown { years: TestedYears::Earlier, count: 6, judged: Some(0.82), guess: Some(0.41), verdict: Verdict::Holds },
    TestShown { years: TestedYears::Later, count: 6, judged: Some(0.74), guess: Some(0.38), verdict: Verdict::Holds },
    TestShown {
        years: TestedYears::Colder,
        count: 6,
        judged: Some(0.61),
        guess: Some(0.44),
        verdict: Verdict::Weakens,
    },
    TestShown { years: TestedYears::Warmer, count: 6, judged: Some(0.2), guess: Some(0.35), verdict: Verdict::Fails },
];

/// A fit with these tests.
pub fn skill(tests: &[TestShown]) -> Skill<'_> {
    Skill { fitted_years: (1981, 1992), fitted: Some(0.85), percent_bias: Some(6.2), tests, uses: &[], river: None }
}

/// Draws one of the pages.
pub fn draw(view: View, canvas: &mut Canvas<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    match view {
        View::Ledger => ledger::draw(canvas, scene, theme, words),
        View::Years => many_years::draw(canvas, scene, theme, words),
        View::Trust => trust::draw(canvas, scene, theme, words),
        View::About => about::draw(canvas, scene, theme, words),
        other => panic!("{other:?} has its own test"),
    }
}

/// Draws a sheet of the help card.
pub fn draw_help(canvas: &mut Canvas<'_>, open: usize, theme: &Theme, words: &Words) {
    help::draw(canvas, open, &key_lines(), theme, (words, None));
}

/// Draws an explanation.
pub fn draw_term(canvas: &mut Canvas<'_>, what: Explained<'_>, scene: &Scene<'_>, theme: &Theme, words: &Words) {
    term::draw(canvas, what, (2, 9), scene.units, theme, (words, None));
}
