//! Specimen sheets, compared pixel by pixel with the pictures in `tests/golden`.
//!
//! `DESHIELO_WRITE_GOLDEN=1 cargo test --test picture_goldens` writes the pictures anew; look at them before you commit
//! them. A sheet that differs is written beside the golden one with the ending `.new.png`.

mod picture_sheets;

#[path = "support/goldens.rs"]
mod goldens;

use deshielo::picture::{Canvas, Theme};

const THEMES: [(&str, Theme); 3] = [("light", Theme::LIGHT), ("dark", Theme::DARK), ("sunlight", Theme::SUNLIGHT)];

/// Draws a sheet on the theme's paper under the strict witness and compares it with its golden picture.
fn check(name: &str, width: u16, height: u16, theme: &Theme, draw: impl FnOnce(&mut Canvas<'_>, &Theme)) {
    goldens::check(name, width, height, |canvas| {
        canvas.fill(canvas.frame(), theme.paper);
        draw(canvas, theme);
    });
}

#[test]
fn type_in_all_sizes() {
    for (name, theme) in &THEMES[..2] {
        check(&format!("picture-type-{name}-800x480"), 800, 480, theme, picture_sheets::type_large);
        check(&format!("picture-type-{name}-320x240"), 320, 240, theme, picture_sheets::type_small);
    }
}

#[test]
fn every_character_of_the_face() {
    check("picture-characters-320x240", 320, 240, &Theme::LIGHT, picture_sheets::characters);
}

#[test]
fn lines_areas_and_shapes() {
    for (name, theme) in &THEMES {
        check(&format!("picture-shapes-{name}-320x240"), 320, 240, theme, picture_sheets::shapes);
    }
}

#[test]
fn charts() {
    for (name, theme) in &THEMES {
        check(&format!("picture-charts-{name}-320x240"), 320, 240, theme, picture_sheets::charts);
        check(&format!("picture-charts-{name}-800x480"), 800, 480, theme, picture_sheets::charts);
    }
}
