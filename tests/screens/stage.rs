//! The stage and its loop with screens in memory.

use std::cell::RefCell;
use std::rc::Rc;
use std::time::{Duration, Instant};

use deshielo::board::{Frame, FrameSize, HandEvent, Key, Post, Screen, ScreenError, ScreenKind, Stage, run};
use embedded_graphics::geometry::Size;
use embedded_graphics::primitives::Rectangle;

use crate::counter::Counter;

/// Remembers what it was given.
struct Memory {
    size: Rc<RefCell<FrameSize>>,
    given: Given,
    fails: bool,
}

impl Screen for Memory {
    fn kind(&self) -> ScreenKind {
        ScreenKind::Pictures
    }

    fn size(&self) -> FrameSize {
        *self.size.borrow()
    }

    fn present(&mut self, frame: &Frame<'_>, changed: &[Rectangle]) -> Result<(), ScreenError> {
        self.given.borrow_mut().push((frame.size, changed.to_vec()));
        if self.fails { Err(ScreenError::new(self.kind(), "unplugged")) } else { Ok(()) }
    }
}

type Given = Rc<RefCell<Vec<(FrameSize, Vec<Rectangle>)>>>;

fn add(stage: &mut Stage<Counter>, width: u16, height: u16, fails: bool) -> (Rc<RefCell<FrameSize>>, Given) {
    let size = Rc::new(RefCell::new(FrameSize::new(width, height)));
    let given = Given::default();
    stage.add(Box::new(Memory { size: Rc::clone(&size), given: Rc::clone(&given), fails }));
    (size, given)
}

#[test]
fn two_screens_show_one_session_each_in_its_size() {
    let mut stage = Stage::new(Counter::default());
    let (_, presenter) = add(&mut stage, 320, 240, false);
    let (_, room) = add(&mut stage, 800, 480, false);
    let (post, hands) = Post::channel();
    post.send(HandEvent::Turn(3));
    post.send(HandEvent::Close);
    run(&mut stage, &hands).unwrap();
    assert_eq!(stage.instrument().count, 3);
    for (given, size) in [(presenter, FrameSize::new(320, 240)), (room, FrameSize::new(800, 480))] {
        let given = given.borrow();
        assert_eq!(given.len(), 2);
        assert!(given.iter().all(|(given, _)| *given == size));
        // First the whole, then the three columns of the bar that are new.
        assert_eq!(given[0].1[0].size, Size::new(size.width.into(), size.height.into()));
        assert_eq!(given[1].1.iter().map(|area| area.size).collect::<Vec<_>>(), [Size::new(3, 8)]);
    }
}

#[test]
fn nothing_is_shown_again_when_nothing_changed() {
    let mut stage = Stage::new(Counter::default());
    let (size, given) = add(&mut stage, 320, 240, false);
    stage.refresh().unwrap();
    stage.hand(HandEvent::Key(Key::Char('q')));
    stage.refresh().unwrap();
    assert_eq!(given.borrow().len(), 1);
    stage.hand(HandEvent::Resize);
    stage.refresh().unwrap();
    assert_eq!(given.borrow().len(), 2);
    *size.borrow_mut() = FrameSize::new(240, 240);
    stage.refresh().unwrap();
    assert_eq!(given.borrow()[2].0, FrameSize::new(240, 240));
}

#[test]
fn it_ticks_only_while_something_moves() {
    let mut stage = Stage::new(Counter::default());
    let (post, hands) = Post::channel();
    assert_eq!(stage.next_tick(), None);
    post.send(HandEvent::Key(Key::Char(' ')));
    let later = std::thread::spawn(move || {
        std::thread::sleep(Duration::from_millis(300));
        post.send(HandEvent::Key(Key::Char('x')));
    });
    let begun = Instant::now();
    run(&mut stage, &hands).unwrap();
    let most = begun.elapsed().as_millis() / 20 + 3;
    later.join().unwrap();
    let counter = stage.instrument();
    assert!(counter.count >= 2 && (counter.count as u128) <= most, "{} ticks", counter.count);
    // Time is told before every other event, and all of it.
    let told: Duration =
        counter.events.iter().map(|event| if let HandEvent::Time(time) = event { *time } else { Duration::ZERO }).sum();
    assert!(told >= Duration::from_millis(300));
    assert!(matches!(counter.events[0], HandEvent::Time(_)));
}

#[test]
fn a_screen_that_fails_ends_it_and_says_why() {
    let mut stage = Stage::new(Counter::default());
    add(&mut stage, 320, 240, true);
    let (_post, hands) = Post::channel();
    assert_eq!(run(&mut stage, &hands), Err(ScreenError::new(ScreenKind::Pictures, "unplugged")));
}

#[test]
fn without_hands_it_ends_instead_of_waiting_for_ever() {
    let mut stage = Stage::new(Counter::default());
    let (post, hands) = Post::channel();
    drop(post);
    run(&mut stage, &hands).unwrap();
}
