//! The test card as an instrument: pages go round by themselves until a hand is touched, then what it says is shown.
//!
//! Nobody needs a hand that works to see that one does not: that is why the pages turn by themselves.

use std::collections::BTreeMap;
use std::sync::mpsc::{Receiver, Sender, channel};
use std::time::Duration;

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use crate::board::file::{BoardFile, HandPart};
use crate::board::hands::{HandState, HandTold, Reading, What};
use crate::board::{Caption, Frame, FrameSize, HandEvent, Instrument, Key, PlacedTexts, Post};
use crate::commands::show::{hand_name, parts, state_words};
use crate::picture::views::staff::{self, Body, StaffCard};
use crate::picture::views::test_card::{HandRow, HandsCard, Mark, draw_colours, draw_hands};
use crate::picture::{Canvas, Theme};
use crate::words::Words;

/// How long a page is shown.
const PAGE: Duration = Duration::from_secs(8);
/// How long what the hands say is shown after the last touch.
const TOUCHED: Duration = Duration::from_secs(25);
/// How long a row is marked after its hand did something.
const FRESH: Duration = Duration::from_millis(1500);
const TICK: Duration = Duration::from_millis(100);

/// A page.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Page {
    /// The test card.
    Colours,
    /// Every hand.
    Hands,
    /// What to do when a kind of hand, or the screen, is silent.
    Silent(usize),
}

/// One part of a hand, with all that it has said.
struct Row {
    hand: usize,
    part: u8,
    state: Option<HandState>,
    reading: Option<Reading>,
    last: Option<HandEvent>,
    detents: i32,
    since: Option<Duration>,
}

/// The instrument.
pub(super) struct Desk {
    board: Option<BoardFile>,
    voices: Vec<Words>,
    voice: usize,
    news: Receiver<HandTold>,
    rows: Vec<Row>,
    at: usize,
    /// What other hands did: those of this computer.
    other: Option<HandEvent>,
    page: Page,
    shown_for: Duration,
    touched: Option<Duration>,
    ended: bool,
    stamp: u64,
    drawn: BTreeMap<(u16, u16), Drawn>,
    captions: Vec<[String; 3]>,
}

struct Drawn {
    stamp: u64,
    pixels: Vec<Rgb565>,
    texts: PlacedTexts,
}

/// Where the hands of the board put what they say.
pub(super) struct NewsListener(
    #[cfg_attr(not(feature = "board"), allow(dead_code, reason = "no board"))] Sender<HandTold>,
);

impl NewsListener {
    /// Starts the hands of the board.
    #[cfg(all(feature = "board", target_os = "linux"))]
    pub fn start(&self, board: Option<&BoardFile>, post: &Post) {
        use crate::board::hands::{Listener, start};
        let (news, post) = (self.0.clone(), post.clone());
        // The desk asks for the time ten times a second and takes the news then; a touch is not to wait for that.
        let listener = Listener::new(move |told| {
            let did = matches!(told.what, What::Did(_));
            news.send(told).is_ok() && (!did || post.send(HandEvent::Time(Duration::ZERO)))
        });
        if let Some(board) = board {
            start(board, &listener);
        }
    }

    /// Elsewhere a board has no hands.
    #[cfg(not(all(feature = "board", target_os = "linux")))]
    pub fn start(&self, _: Option<&BoardFile>, _: &Post) {}
}

impl Desk {
    /// The desk of a board, which speaks those languages in turn.
    pub fn new(board: Option<BoardFile>, voices: Vec<Words>) -> (Self, NewsListener) {
        let (sender, news) = channel();
        let mut rows = Vec::new();
        for (index, hand) in board.iter().flat_map(|board| &board.hands).enumerate() {
            rows.extend(parts(hand).into_iter().map(|part| Row {
                hand: index,
                part,
                state: None,
                reading: None,
                last: None,
                detents: 0,
                since: None,
            }));
        }
        let caption = |words: &Words| {
            let title = words.say("test-card-hands", &[]);
            [title, words.say("wiring-foot", &[]), words.say("show-too-small", &[])]
        };
        let captions = voices.iter().map(caption).collect();
        let desk = Self {
            board,
            voices,
            voice: 0,
            news,
            rows,
            at: 0,
            other: None,
            page: Page::Colours,
            shown_for: Duration::ZERO,
            touched: None,
            ended: false,
            stamp: 1,
            drawn: BTreeMap::new(),
            captions,
        };
        (desk, NewsListener(sender))
    }

    /// Every page, in the order in which they go round.
    pub fn pages(&self) -> Vec<Page> {
        let silent = (0..self.silent_ids().len()).map(Page::Silent);
        [Page::Colours, Page::Hands].into_iter().chain(silent).collect()
    }

    /// Shows a page.
    pub fn turn_to(&mut self, page: Page) {
        self.page = page;
        self.shown_for = Duration::ZERO;
        self.stamp += 1;
    }

    /// What may be silent on this board: the messages that say what to do.
    fn silent_ids(&self) -> Vec<&'static str> {
        let mut ids = vec!["silent-screen"];
        for hand in self.board.iter().flat_map(|board| &board.hands) {
            let id = silent_id(hand);
            if !ids.contains(&id) {
                ids.push(id);
            }
        }
        ids
    }

    fn touch(&mut self) {
        self.touched = Some(Duration::ZERO);
        if self.page != Page::Hands {
            self.turn_to(Page::Hands);
        }
        self.stamp += 1;
    }

    fn take_news(&mut self) {
        while let Ok(HandTold { hand, part, what }) = self.news.try_recv() {
            let Some(index) = self.rows.iter().position(|row| (row.hand, row.part) == (hand, part)) else { continue };
            self.stamp += 1;
            let row = &mut self.rows[index];
            match what {
                What::Is(state) => row.state = Some(state),
                What::Reads(reading) => row.reading = Some(reading),
                What::Did(event) => {
                    if let HandEvent::Turn(detents) | HandEvent::TurnDial { detents, .. } = event {
                        row.detents = row.detents.saturating_add(detents);
                    }
                    (row.last, row.since) = (Some(event), Some(Duration::ZERO));
                    self.at = index;
                    self.touch();
                }
            }
        }
    }

    fn time(&mut self, gone_by: Duration) {
        self.take_news();
        self.shown_for = self.shown_for.saturating_add(gone_by);
        self.touched = self.touched.map(|since| since.saturating_add(gone_by)).filter(|since| *since < TOUCHED);
        for row in &mut self.rows {
            let Some(since) = row.since.as_mut().filter(|since| **since < FRESH) else { continue };
            *since = since.saturating_add(gone_by);
            if *since >= FRESH {
                self.stamp += 1;
            }
        }
        if self.touched.is_some() || self.shown_for < PAGE {
            return;
        }
        let pages = self.pages();
        let next = pages.iter().position(|page| *page == self.page).map_or(0, |at| at + 1);
        if next >= pages.len() {
            self.voice = (self.voice + 1) % self.voices.len().max(1);
        }
        self.turn_to(pages[next % pages.len()]);
    }

    fn row_told(&self, row: &Row, words: &Words) -> HandRow {
        let hand = self.board.as_ref().and_then(|board| board.hands.get(row.hand));
        let name = hand.map(|hand| hand_name(hand, row.part, words)).unwrap_or_default();
        let wrong = row.state.as_ref().and_then(|state| state_words(state, words));
        let level = match row.reading {
            Some(Reading::Share(share)) => Some(share),
            _ => None,
        };
        let mark = match (&wrong, row.since, &row.reading) {
            (Some(_), ..) => Mark::Wrong,
            (None, Some(since), _) if since < FRESH => Mark::Fresh,
            (None, Some(_), _) => Mark::Heard,
            _ => Mark::Silent,
        };
        let value = wrong.unwrap_or_else(|| said(row, words));
        HandRow { name, value, mark, level }
    }

    /// What to do about the first hand that is wrong, else about the first that was never heard.
    fn advice(&self, words: &Words) -> String {
        let hands = self.board.iter().flat_map(|board| &board.hands).collect::<Vec<_>>();
        if hands.is_empty() {
            let id = if self.board.is_some() { "wiring-no-hands" } else { "wiring-no-board" };
            return words.say(id, &[]);
        }
        let wrong = self.rows.iter().find(|row| row.state.as_ref().is_some_and(|state| *state != HandState::There));
        match wrong.and_then(|row| Some((row, hands.get(row.hand)?))) {
            Some((row, hand)) => match &row.state {
                Some(HandState::Lost(reason)) => {
                    let todo = words.say(&format!("{}.brief", silent_id(hand)), &[]);
                    format!("{todo} ({reason})")
                }
                Some(HandState::Stuck(_)) => words.say("wiring-stuck", &[]),
                _ => String::new(),
            },
            None if self.rows.iter().any(|row| row.since.is_none()) => words.say("wiring-touch-each", &[]),
            None => words.say("wiring-all-heard", &[]),
        }
    }

    fn draw(&self, canvas: &mut Canvas<'_>) {
        let Some(words) = self.voices.get(self.voice) else { return };
        match self.page {
            Page::Colours => draw_colours(canvas, words),
            Page::Hands => {
                let mut rows: Vec<HandRow> = self.rows.iter().map(|row| self.row_told(row, words)).collect();
                if let Some(event) = self.other {
                    let value = did(event, 0, words);
                    rows.push(HandRow { name: words.say("hand-here", &[]), value, mark: Mark::Heard, level: None });
                }
                let advice = self.advice(words);
                draw_hands(canvas, &HandsCard { rows: &rows, at: self.at, advice: &advice }, &Theme::LIGHT, words);
            }
            Page::Silent(index) => {
                let ids = self.silent_ids();
                let Some(id) = ids.get(index) else { return };
                let (title, text) = (words.say(&format!("{id}.title"), &[]), words.say(id, &[]));
                let foot = words.say("wiring-foot", &[]);
                let card = StaffCard { title: &title, body: Body::Text(&text), foot: &foot };
                staff::draw(canvas, &card, &Theme::LIGHT);
            }
        }
    }
}

/// The message that says what to do when such a hand is silent.
fn silent_id(hand: &HandPart) -> &'static str {
    match hand {
        HandPart::InputDevice(_) => "silent-input-device",
        HandPart::Touchscreen(_) => "silent-touchscreen",
        HandPart::Encoder(_) => "silent-encoder",
        HandPart::Button(_) => "silent-button",
        HandPart::Converter(_) => "silent-converter",
    }
}

/// What a row says.
fn said(row: &Row, words: &Words) -> String {
    let id = |closed: bool| if closed { "hand-closed" } else { "hand-open" };
    let closed = |closed: bool| words.say(id(closed), &[]);
    match (row.last, row.reading) {
        (_, Some(Reading::Share(share))) => {
            let percent = words.number(share * 100.0, 0);
            words.say("hand-share", &[("percent", percent.into())])
        }
        (Some(event), _) => did(event, row.detents, words),
        (None, Some(Reading::Contacts(a, b))) => {
            words.say("hand-contacts", &[("a", closed(a).into()), ("b", closed(b).into())])
        }
        (None, Some(Reading::Contact(contact))) => closed(contact),
        (None, None) => words.say("hand-silent", &[]),
    }
}

fn did(event: HandEvent, detents: i32, words: &Words) -> String {
    match event {
        HandEvent::Turn(_) | HandEvent::TurnDial { .. } => {
            let sign = if detents > 0 { "+" } else { "" };
            let count = format!("{sign}{}", words.number(f64::from(detents), 0));
            words.say("hand-turned", &[("detents", count.into())])
        }
        HandEvent::Press => words.say("hand-pressed", &[]),
        HandEvent::LongPress => words.say("hand-held", &[]),
        HandEvent::SetDial { share, .. } => {
            words.say("hand-share", &[("percent", words.number(share * 100.0, 0).into())])
        }
        HandEvent::Pointer { x, y, .. } => {
            words.say("hand-at", &[("x", x.to_string().into()), ("y", y.to_string().into())])
        }
        HandEvent::Key(Key::Char(letter)) if letter != ' ' => {
            words.say("hand-key", &[("key", letter.to_string().into())])
        }
        HandEvent::Key(_) => words.say("hand-some-key", &[]),
        HandEvent::Time(_) | HandEvent::Resize | HandEvent::Close => String::new(),
    }
}

impl Instrument for Desk {
    fn event(&mut self, event: HandEvent) {
        match event {
            HandEvent::Time(gone_by) => self.time(gone_by),
            HandEvent::Resize => {}
            HandEvent::Close => self.ended = true,
            HandEvent::Key(Key::Escape) => self.ended = true,
            event => {
                self.other = Some(event);
                self.touch();
            }
        }
    }

    fn frame(&mut self, size: FrameSize, _: bool) -> Frame<'_> {
        let key = (size.width, size.height);
        if self.drawn.get(&key).is_none_or(|drawn| drawn.stamp != self.stamp) {
            let mut drawn = self.drawn.remove(&key).unwrap_or_else(|| Drawn {
                stamp: 0,
                pixels: vec![Rgb565::BLACK; size.pixels()],
                texts: PlacedTexts::default(),
            });
            drawn.texts.0.clear();
            if let Ok(canvas) = Canvas::new(&mut drawn.pixels, size.width, size.height) {
                self.draw(&mut canvas.with_witness(&mut drawn.texts));
            }
            drawn.stamp = self.stamp;
            self.drawn.clear();
            self.drawn.insert(key, drawn);
        }
        let (pixels, texts) = match self.drawn.get(&key) {
            Some(drawn) => (drawn.pixels.as_slice(), drawn.texts.0.as_slice()),
            None => (&[][..], &[][..]),
        };
        Frame { size, pixels, texts }
    }

    fn wants_tick(&self) -> Option<Duration> {
        Some(TICK)
    }

    fn done(&self) -> bool {
        self.ended
    }

    fn caption(&self) -> Caption<'_> {
        match self.captions.get(self.voice) {
            Some([title, hint, too_small]) => Caption { title, hint, too_small },
            None => Caption::default(),
        }
    }
}
