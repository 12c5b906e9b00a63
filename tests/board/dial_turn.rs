//! What one detent of a dial costs on the wire.

use deshielo::board::Frame;
use deshielo::board::file::Turned;
use deshielo::picture::changes::changes;
use deshielo::picture::{Canvas, Theme};
use deshielo::water::dials::{Dial, Dials};
use deshielo::words::Words;

use crate::frames::Drawn;
use crate::panels::LYING_320X240;
use crate::scenes::{Land, PAGES, Play, draw, steep_valley};

/// Bytes of a whole frame of 320 × 240.
const WHOLE: u64 = 320 * 240 * 2;

#[test]
fn a_dial_turn_sends_a_small_part_of_the_frame() {
    let land = Land::new(steep_valley(), 3, 5);
    let (words, _) = Words::new("en-US");
    let (mut turns, mut sum, mut most) = (0, 0, 0);
    for view in PAGES {
        for dial in [Dial::Warming, Dial::WinterPrecipitation, Dial::Diversion, Dial::CanalLining, Dial::RiverMinimum] {
            let (chip, mut surface) = LYING_320X240.start(Turned::By90, true);
            let mut drawn = Drawn::black(surface.size());
            let step = dial.widest().step;
            let chosen = Dial::ALL.iter().position(|other| *other == dial).unwrap();
            for detent in 1..=5 {
                let dials = Dials::REST.with(dial, f64::from(detent) * step);
                let before = drawn.pixels.clone();
                let play = Play { dials, chosen, ..Play::warm() };
                land.show(play, |scene| {
                    let mut canvas = Canvas::new(&mut drawn.pixels, 320, 240).unwrap();
                    draw(view, &mut canvas, scene, &Theme::LIGHT, &words);
                });
                let sent = chip.borrow().bytes;
                let boxes = changes(&before, &drawn.pixels, 320);
                surface.show(&Frame { size: drawn.size, pixels: &drawn.pixels, texts: &[] }, &boxes).unwrap();
                // The first shows the page; the others are turns.
                if detent > 1 {
                    let sent = chip.borrow().bytes - sent;
                    (turns, sum, most) = (turns + 1, sum + sent, most.max(sent));
                }
            }
        }
    }
    let mean = sum / turns;
    println!("bytes a dial turn: {mean} on average, {most} at most, {WHOLE} for a whole frame");
    assert!(turns == 60 && mean > 0);
    assert!(mean < WHOLE / 5 && most < WHOLE * 3 / 5, "{mean} on average, {most} at most");
}
