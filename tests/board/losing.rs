//! Screens that fail at any moment: the instrument plays on, it is said once, and they come back with the whole picture.

use std::cell::{Cell, RefCell};
use std::rc::Rc;
use std::time::{Duration, Instant};

use deshielo::board::reviving::{EVERY, LONGEST_WAIT, Notice, Reviving, Surface};
use deshielo::board::{Caption, Frame, FrameSize, HandEvent, Instrument, Light, Screen, ScreenKind, Stage};
use embedded_graphics::primitives::{PointsIter, Rectangle};
use proptest::prelude::*;

use crate::frames::{Dice, Drawn};

const SIZE: FrameSize = FrameSize::new(240, 240);

/// The world around a screen: whether it works, what it shows, and what time it is.
#[derive(Default)]
struct World {
    works: Cell<bool>,
    /// It works again but shows something else.
    plugged: Cell<u32>,
    light: Cell<Light>,
    shown: RefCell<Vec<embedded_graphics::pixelcolor::Rgb565>>,
    told: RefCell<Vec<Notice>>,
    tries: Cell<u32>,
    passed: Cell<Duration>,
}

struct Fake(Rc<World>, u32);

impl Fake {
    fn works(&self) -> Result<(), String> {
        if self.0.works.get() && self.1 == self.0.plugged.get() { Ok(()) } else { Err("unplugged".to_owned()) }
    }
}

impl Surface for Fake {
    fn size(&self) -> FrameSize {
        SIZE
    }

    fn show(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), String> {
        self.works()?;
        let mut shown = self.0.shown.borrow_mut();
        for area in changed {
            for point in area.points().filter(|point| (0..240).contains(&point.x) && (0..240).contains(&point.y)) {
                let at = point.y as usize * 240 + point.x as usize;
                shown[at] = frame.pixels[at];
            }
        }
        Ok(())
    }

    fn light(&mut self, light: Light) -> Result<(), String> {
        self.works()?;
        self.0.light.set(light);
        Ok(())
    }

    fn check(&mut self) -> Result<(), String> {
        self.works()
    }

    fn starts_anew_after_dark(&self) -> bool {
        true
    }
}

fn screen(world: &Rc<World>) -> Reviving {
    let (opened, told, clock, began) = (Rc::clone(world), Rc::clone(world), Rc::clone(world), Instant::now());
    let open = move || -> Result<Box<dyn Surface>, String> {
        opened.tries.set(opened.tries.get() + 1);
        let fake = Fake(Rc::clone(&opened), opened.plugged.get());
        fake.works()?;
        // A screen that starts is full and shows nothing.
        opened.light.set(Light::Full);
        *opened.shown.borrow_mut() = Drawn::black(SIZE).pixels;
        Ok(Box::new(fake))
    };
    let told = move |notice| told.told.borrow_mut().push(notice);
    let clock = move || began + clock.passed.get();
    Reviving::with_clock(ScreenKind::Panel, SIZE, Box::new(open), Box::new(told), Box::new(clock))
}

fn wait(world: &World, time: Duration) {
    world.passed.set(world.passed.get() + time);
}

#[test]
fn a_screen_that_is_not_there_is_waited_for_ever_more_patiently() {
    let world = Rc::new(World::default());
    let mut screen = screen(&world);
    assert!(!screen.is_there() && matches!(world.told.borrow()[..], [Notice::Lost(_)]));
    let mut tried_at = vec![];
    for second in 0..120 {
        let before = world.tries.get();
        assert!(!screen.tend());
        if world.tries.get() > before {
            tried_at.push(second);
        }
        wait(&world, Duration::from_secs(1));
    }
    assert_eq!(tried_at, [2, 6, 14, 30, 46, 62, 78, 94, 110]);
    assert_eq!(world.told.borrow().len(), 1, "it is said once");
    world.works.set(true);
    wait(&world, LONGEST_WAIT);
    assert!(screen.tend() && screen.is_there());
    assert_eq!(world.told.borrow()[1..], [Notice::Back(ScreenKind::Panel)]);
    assert_eq!(screen.wants_tending(), Some(EVERY));
}

#[test]
fn a_morning_starts_a_panel_anew() {
    let world = Rc::new(World::default());
    world.works.set(true);
    let mut screen = screen(&world);
    assert!(!screen.light(Light::Off) && !screen.light(Light::Off));
    assert_eq!((world.light.get(), world.tries.get()), (Light::Off, 1));
    assert!(screen.light(Light::Dim), "a whole frame is wanted");
    assert_eq!((world.light.get(), world.tries.get()), (Light::Dim, 2));
    assert!(!screen.light(Light::Full));
    assert!(world.told.borrow().is_empty());
    world.works.set(false);
    screen.light(Light::Off);
    assert!(!screen.is_there());
}

/// Shows one frame that never moves, at a light that may change.
struct Still(Drawn, Rc<Cell<Light>>);

impl Instrument for Still {
    fn event(&mut self, _: HandEvent) {}

    fn frame(&mut self, size: FrameSize, _: bool) -> Frame<'_> {
        Frame { size, pixels: &self.0.pixels, texts: &[] }
    }

    fn wants_tick(&self) -> Option<Duration> {
        None
    }

    fn done(&self) -> bool {
        false
    }

    fn caption(&self) -> Caption<'_> {
        Caption::default()
    }

    fn light(&self) -> Light {
        self.1.get()
    }
}

#[test]
fn a_stage_on_which_nothing_moves_still_looks_after_its_screens() {
    let world = Rc::new(World::default());
    let mut drawn = Drawn::black(SIZE);
    drawn.scribble(&mut Dice::new(11));
    let (pixels, light) = (drawn.pixels.clone(), Rc::new(Cell::new(Light::Full)));
    let mut stage = Stage::new(Still(drawn, Rc::clone(&light)));
    stage.add(Box::new(screen(&world)));
    stage.refresh().unwrap();
    world.works.set(true);
    wait(&world, EVERY);
    // Nobody touches anything: the stage itself says when it wants to be woken.
    let due = stage.next_tick().unwrap();
    assert!(due <= Instant::now() + EVERY);
    std::thread::sleep(due.saturating_duration_since(Instant::now()));
    stage.tick();
    stage.refresh().unwrap();
    assert!(*world.shown.borrow() == pixels);
    light.set(Light::Dim);
    stage.refresh().unwrap();
    assert_eq!((world.light.get(), world.told.borrow().len()), (Light::Dim, 2));
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 200, failure_persistence: None, ..ProptestConfig::default() })]

    /// Whatever fails in whichever order: once it works and was tended, it shows the frame, at the light that was asked for.
    #[test]
    fn after_any_failures_the_whole_picture_is_there(steps in prop::collection::vec(0..7_u8, 1..60), seed in 1_u32..9999) {
        let world = Rc::new(World::default());
        world.works.set(true);
        let mut screen = screen(&world);
        let mut drawn = Drawn::black(SIZE);
        let mut dice = Dice::new(seed);
        let mut spoilt = true;
        let mut light = Light::Full;
        for step in steps {
            match step {
                0 | 1 => {}
                2 => world.works.set(!world.works.get()),
                // Unplugged and in again between two looks.
                3 => world.plugged.set(world.plugged.get() + 1),
                4 => wait(&world, EVERY),
                5 => spoilt |= screen.tend(),
                _ => {
                    light = [Light::Full, Light::Dim, Light::Off][dice.below(3) as usize];
                    spoilt |= screen.light(light);
                }
            }
            // As a stage does: only what changed, unless the screen lost what it showed.
            let mut changed = drawn.scribble(&mut dice);
            if std::mem::take(&mut spoilt) {
                changed = vec![drawn.whole()];
            }
            screen.present(&Frame { size: SIZE, pixels: &drawn.pixels, texts: &[] }, &changed).unwrap();
        }
        world.works.set(true);
        for _ in 0..3 {
            wait(&world, LONGEST_WAIT);
            spoilt |= screen.tend();
        }
        prop_assert!(screen.is_there());
        let changed = if spoilt { vec![drawn.whole()] } else { drawn.scribble(&mut dice) };
        screen.present(&Frame { size: SIZE, pixels: &drawn.pixels, texts: &[] }, &changed).unwrap();
        prop_assert!(*world.shown.borrow() == drawn.pixels, "not the frame");
        prop_assert_eq!(world.light.get(), light);
        // Losses and returns take turns.
        let told = world.told.borrow();
        let kinds: Vec<bool> = told.iter().map(|notice| matches!(notice, Notice::Lost(_))).collect();
        prop_assert!(kinds.windows(2).all(|pair| pair[0] != pair[1]) && kinds.first() != Some(&false));
    }
}
