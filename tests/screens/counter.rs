//! A small instrument for tests: it counts turns, in pixels and in words.

use std::time::Duration;

use deshielo::board::{Caption, Frame, FrameSize, HandEvent, Instrument, Key, PlacedText, Post, Stage, run, terminal};
use embedded_graphics::geometry::{Point, Size};
use embedded_graphics::pixelcolor::{Rgb565, RgbColor};
use embedded_graphics::primitives::Rectangle;

/// Counts turns and up keys; space lets it count by itself; p panics; x ends it.
#[derive(Debug, Default)]
pub struct Counter {
    pub count: i32,
    pub moving: bool,
    pub ended: bool,
    /// Everything that came in.
    pub events: Vec<HandEvent>,
    pixels: Vec<Rgb565>,
    texts: Vec<PlacedText>,
}

impl Instrument for Counter {
    fn event(&mut self, event: HandEvent) {
        self.events.push(event);
        match event {
            HandEvent::Turn(detents) => self.count += detents,
            HandEvent::Time(_) if self.moving => self.count += 1,
            HandEvent::Key(Key::Up) => self.count += 1,
            HandEvent::Key(Key::Char(' ')) => self.moving = !self.moving,
            HandEvent::Key(Key::Char('x')) => self.ended = true,
            HandEvent::Key(Key::Char('p')) => panic!("the counter was told to panic"),
            _ => {}
        }
    }

    fn frame(&mut self, size: FrameSize, texts: bool) -> Frame<'_> {
        self.pixels = vec![Rgb565::WHITE; size.pixels()];
        let bar = usize::try_from(self.count).unwrap_or(0).min(usize::from(size.width));
        for row in self.pixels.chunks_mut(size.width.into()).take(8) {
            row[..bar].fill(Rgb565::BLUE);
        }
        let ink = Rectangle::new(Point::new(20, 40), Size::new(80, 8));
        let text = format!("count {} in {size}", self.count);
        self.texts = if texts { vec![PlacedText { text, ink, given: None }] } else { Vec::new() };
        Frame { size, pixels: &self.pixels, texts: &self.texts }
    }

    fn wants_tick(&self) -> Option<Duration> {
        self.moving.then_some(Duration::from_millis(20))
    }

    fn done(&self) -> bool {
        self.ended
    }

    fn caption(&self) -> Caption<'_> {
        Caption { title: "counter", hint: "up: more", too_small: "too small" }
    }
}

/// The variable that turns this test program into a counter on its terminal.
pub const AS_COUNTER: &str = "DESHIELO_TEST_COUNTER";

/// Not a test by itself: the program that the terminal tests start in a pseudo-terminal.
#[test]
fn counter_on_a_terminal() {
    if std::env::var_os(AS_COUNTER).is_none() {
        return;
    }
    let ability = terminal::Ability::of_environment(|name| std::env::var(name).ok()).unwrap();
    let (post, hands) = Post::channel();
    let mut stage = Stage::new(Counter::default());
    stage.add(Box::new(terminal::Terminal::open(ability, None, &post).unwrap()));
    run(&mut stage, &hands).unwrap();
    drop(stage);
    println!("ended in good order");
}
