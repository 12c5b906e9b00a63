//! `show --kiosk`: the player with everything around it that an unattended screen needs.
//!
//! The rules are the session's ([`crate::session::kiosk`]); here they meet the clock, the card, the service manager, the
//! power supply and the light of the screen.

mod hands;
mod note_words;
mod obey;
mod over;
mod player;
mod set_pin;
mod staff_words;
mod wall;

use std::io::IsTerminal;
use std::path::Path;
use std::time::{Duration, Instant};

use super::player::Player;
use super::request::Request;
use crate::board::backlight::Backlight;
use crate::board::light::Light;
use crate::board::power::PowerWatch;
use crate::board::watchdog::Watchdog;
use crate::board::{Caption, Frame, FrameSize, HandEvent, Instrument};
use crate::commands::keep_folder::keep_folder;
use crate::commands::tell_standard_error;
use crate::keep::{Folder, Guesses, Keep, Messages, Settings, Tally};
use crate::session::kiosk::wishes::LEAST_LIGHT;
use crate::session::kiosk::{Kiosk, Over};
use crate::words::Words;
use hands::Fingers;
pub(in crate::commands) use note_words::note_words;
use over::Covered;
pub(super) use set_pin::set_pin;
use wall::WallClock;

/// Where the kernel tells of the board.
const SYSTEM_FILES: &str = "/sys";
/// From one look at the power supply to the next.
const POWER_EVERY: Duration = Duration::from_secs(10);
/// Where the instrument is goes to the card when it has been left there so long.
const SETTLES_MS: u32 = 3000;
/// What the staff has set goes to the card when nothing more was set for so long.
const WISHES_SETTLE_MS: u32 = 1000;
/// The tally goes to the card no more often.
const TALLY_EVERY_MS: u32 = 600_000;

/// An unattended instrument.
pub(super) struct KioskPlayer {
    player: Player,
    kiosk: Kiosk,
    /// Said in the log.
    words: Words,
    place: String,
    keep: Option<Keep<Folder>>,
    settings: Settings,
    tally: Tally,
    /// As they are on the card.
    guesses: Option<Guesses>,
    messages: Messages,
    found_damage: bool,
    fingers: Fingers,
    wall: WallClock,
    power: PowerWatch,
    power_looked: Option<Instant>,
    light: Backlight,
    watchdog: Watchdog,
    began: Instant,
    rest: Duration,
    covered: Vec<Covered>,
    /// The player's stamp when where it is was kept last, and for how long it has been the same.
    kept_stamp: u64,
    seen_stamp: u64,
    still_ms: u32,
    wishes_wait_ms: Option<u32>,
    /// The lesson that was counted in this visit.
    counted_lesson: Option<String>,
    tally_waits: bool,
    since_tally_ms: u32,
    has_ended: bool,
}

impl KioskPlayer {
    /// Goes on where it was, as far as anything was kept.
    pub fn new(mut player: Player, request: &Request, words: Words) -> Self {
        let mut keep = keep_in(request);
        if keep.is_none() {
            tell(words.say("keep-no-folder", &[]));
        }
        let settings = keep.as_mut().map(Keep::settings).unwrap_or_default();
        let tally = keep.as_mut().map(Keep::tally).unwrap_or_default();
        let guesses = keep.as_mut().and_then(Keep::guesses);
        let notes = keep.as_mut().map(Keep::take_notes).unwrap_or_default();
        notes.iter().for_each(|note| tell(note_words(note, &words)));
        let place = request.place.display().to_string();
        let mut kiosk = Kiosk::new(settings.wishes, settings.pin.is_some(), settings.wrong_pins);
        match settings.whereabouts.as_ref().filter(|_| settings.place == place) {
            Some(whereabouts) => {
                player.return_to(whereabouts);
                if settings.left_alone {
                    kiosk = kiosk.left_alone();
                }
            }
            None if player.has_lesson() => {}
            None => kiosk = kiosk.left_alone(),
        }
        // A lesson that the command line names goes before one that was under way.
        if let Some(kept) = guesses.as_ref().filter(|_| settings.place == place && !player.has_lesson())
            && player.take_up(kept, &words)
        {
            kiosk.set_lesson(true);
        }
        let stamp = player.stamp();
        let system_files = Path::new(SYSTEM_FILES);
        let mut kiosk_player = Self {
            kiosk,
            words,
            place,
            keep,
            settings,
            tally,
            guesses,
            messages: Messages::default(),
            found_damage: !notes.is_empty(),
            fingers: Fingers::default(),
            wall: WallClock::new(Path::new("/")),
            power: PowerWatch::new(system_files),
            power_looked: None,
            light: Backlight::find(system_files),
            watchdog: Watchdog::of_environment(|name| std::env::var(name).ok()),
            began: Instant::now(),
            rest: Duration::ZERO,
            covered: Vec::new(),
            kept_stamp: stamp,
            seen_stamp: stamp,
            still_ms: 0,
            wishes_wait_ms: None,
            counted_lesson: None,
            tally_waits: false,
            since_tally_ms: TALLY_EVERY_MS,
            has_ended: false,
            player,
        };
        kiosk_player.read_messages();
        kiosk_player
    }

    fn time(&mut self, gone_by: Duration) {
        self.rest = self.rest.saturating_add(gone_by);
        let elapsed_ms = u32::try_from(self.rest.as_millis()).unwrap_or(u32::MAX);
        self.rest = self.rest.saturating_sub(Duration::from_millis(elapsed_ms.into()));
        if let Some(hand) = self.fingers.hand(HandEvent::Time(gone_by), false) {
            let reaction = self.kiosk.hand(hand);
            self.obey(&reaction.orders);
        }
        self.kiosk.set_lesson(self.player.has_lesson());
        let wall = self.wall.read();
        let orders = self.kiosk.tick(elapsed_ms, wall, self.player.offer());
        self.obey(&orders);
        self.keep_in_time(elapsed_ms);
        self.look_at_power();
    }

    fn look_at_power(&mut self) {
        if self.power_looked.is_some_and(|at| at.elapsed() < POWER_EVERY) {
            return;
        }
        self.power_looked = Some(Instant::now());
        let was_low = self.power.supply().is_low == Some(true);
        let is_low = self.power.look().map_or(was_low, |supply| supply.is_low == Some(true));
        if is_low != was_low {
            let id = if is_low { "kiosk-power-low" } else { "kiosk-power-fine" };
            log(self.words.say(id, &[]));
        }
    }
}

impl Instrument for KioskPlayer {
    fn event(&mut self, event: HandEvent) {
        match event {
            HandEvent::Time(gone_by) => {
                self.time(gone_by);
                self.player.event(event);
            }
            HandEvent::Resize => {}
            HandEvent::Close => self.end(),
            _ => {
                let in_menu = matches!(self.kiosk.over(), Over::Staff(_));
                let Some(hand) = self.fingers.hand(event, in_menu) else { return };
                let reaction = self.kiosk.hand(hand);
                self.obey(&reaction.orders);
                let before = *self.player.shown();
                if reaction.pass {
                    self.player.event(event);
                }
                let orders = self.kiosk.noticed(&before, self.player.shown());
                self.obey(&orders);
                self.count_lesson();
            }
        }
    }

    fn frame(&mut self, size: FrameSize, texts: bool) -> Frame<'_> {
        // In the loop that draws: should drawing or showing stand still, nothing is fed, and the manager starts us anew.
        self.watchdog.feed();
        self.light.set(self.kiosk.light_percent());
        self.draw(size, texts)
    }

    fn wants_tick(&self) -> Option<Duration> {
        let due = Duration::from_millis(self.kiosk.due_ms().into());
        let settles = self.settles_in_ms().map(|ms| Duration::from_millis(ms.into()));
        let others = [self.player.wants_tick(), self.watchdog.interval(), self.fingers.due(), settles];
        others.into_iter().flatten().chain([due]).min()
    }

    fn light(&self) -> Light {
        match self.kiosk.light_percent() {
            0 => Light::Off,
            percent if percent < LEAST_LIGHT.saturating_add(1) => Light::Dim,
            _ => Light::Full,
        }
    }

    fn done(&self) -> bool {
        self.has_ended
    }

    fn caption(&self) -> Caption<'_> {
        self.player.caption()
    }
}

/// The files in the folder that the command line names, or the usual one.
fn keep_in(request: &Request) -> Option<Keep<Folder>> {
    keep_folder(request.keep.as_deref()).map(|folder| Keep::new(Folder::new(folder)))
}

/// One line in the log while pictures are shown. On a terminal it would be written over the picture; there the staff menu
/// tells the same.
fn log(line: String) {
    if !std::io::stderr().is_terminal() {
        tell(line);
    }
}

/// One line before or after pictures are shown.
fn tell(line: String) {
    tell_standard_error(&[line]);
}
