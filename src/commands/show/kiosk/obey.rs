//! What the kiosk's orders do, and when what is brought to the card.

use super::note_words::note_words;
use super::{KioskPlayer, SETTLES_MS, TALLY_EVERY_MS, WISHES_SETTLE_MS, log};
use crate::keep::Note;
use crate::session::kiosk::{Count, Order, Orders};

impl KioskPlayer {
    /// Carries them out, one after the other.
    pub(super) fn obey(&mut self, orders: &Orders) {
        for order in orders.iter() {
            match *order {
                Order::Session(event) => self.player.step_session(event),
                Order::Look(look) => self.player.look(look),
                Order::Leave => {
                    self.player.leave();
                    self.counted_lesson = None;
                    self.keep_guesses();
                    self.read_messages();
                    self.keep_where(true);
                }
                Order::CountVisit => self.count(&Count::Visit),
                Order::CountMinutes(minutes) => self.count(&Count::Minutes(minutes)),
                Order::CountView(view) => self.count(&Count::View(view)),
                Order::CountDial(dial) => self.count(&Count::Dial(dial)),
                Order::CountVoice(voice) => {
                    if let Some(voice) = self.player.offer().voices().get(voice) {
                        let language = |tag: &str| tag.split('-').next().unwrap_or_default().to_owned();
                        let mut key = language(&voice.first);
                        if let Some(second) = &voice.second {
                            key = format!("{key}+{}", language(second));
                        }
                        self.count(&Count::Language(&key));
                    }
                }
                Order::CheckPin => {
                    let typed = self.kiosk.pin_digits();
                    let right = self.settings.pin.as_ref().is_some_and(|pin| pin.is(typed));
                    let orders = self.kiosk.pin_checked(right);
                    self.obey(&orders);
                }
                Order::KeepWishes => {
                    self.settings.wishes = *self.kiosk.wishes();
                    // A value that is being turned does not go to the card at every detent.
                    self.wishes_wait_ms = Some(0);
                }
                Order::KeepWrongPins(wrong) => {
                    self.settings.wrong_pins = wrong;
                    self.keep_settings();
                }
                Order::ForgetGuesses => {
                    self.player.leave();
                    self.keep_guesses();
                }
                Order::StartAgain => {
                    self.player.start_again();
                    self.keep_where(true);
                }
                Order::End => self.end(),
            }
        }
    }

    fn count(&mut self, count: &Count<'_>) {
        let day = self.kiosk.clock().ok().map(|wall| wall.local_day);
        self.tally.add(count, day);
        self.tally_waits = true;
    }

    /// A lesson that was begun counts once a visit.
    pub(super) fn count_lesson(&mut self) {
        let open = self.player.lesson_key();
        if let Some(key) = open.filter(|key| self.counted_lesson.as_deref() != Some(key)).map(str::to_owned) {
            self.count(&Count::Lesson(&key));
            self.counted_lesson = Some(key);
        }
    }

    /// The guesses go to the card where they have changed.
    fn keep_guesses(&mut self) {
        let now = self.player.led().kept();
        if now != self.guesses {
            self.guesses = now;
            let note = self.keep.as_mut().and_then(|keep| keep.keep_guesses(self.guesses.as_ref()));
            self.note(note);
        }
    }

    /// The message of the day may have been written anew.
    pub(super) fn read_messages(&mut self) {
        let Some(keep) = &self.keep else { return };
        let (messages, left_out) = keep.messages();
        if left_out > 0 && messages != self.messages {
            log(self.words.say("keep-message-bad", &[]));
        }
        self.messages = messages;
    }

    /// Time went by: what has been waiting long enough goes to the card.
    pub(super) fn keep_in_time(&mut self, elapsed_ms: u32) {
        self.kiosk.set_message(self.message().is_some());
        self.since_tally_ms = self.since_tally_ms.saturating_add(elapsed_ms);
        if self.tally_waits && self.since_tally_ms >= TALLY_EVERY_MS {
            self.keep_tally();
        }
        self.wishes_wait_ms = self.wishes_wait_ms.map(|waits| waits.saturating_add(elapsed_ms));
        if self.wishes_wait_ms.is_some_and(|waits| waits >= WISHES_SETTLE_MS) {
            self.keep_settings();
        }
        let stamp = self.player.stamp();
        let is_still = std::mem::replace(&mut self.seen_stamp, stamp) == stamp;
        self.still_ms = if is_still { self.still_ms.saturating_add(elapsed_ms) } else { 0 };
        // What the stroll shows is nobody's place to go back to.
        if self.kiosk.is_visit() && stamp != self.kept_stamp && self.still_ms >= SETTLES_MS {
            self.keep_where(false);
            self.keep_guesses();
        }
    }

    /// When something wants to be kept, ms.
    pub(super) fn settles_in_ms(&self) -> Option<u32> {
        let waits = self.kiosk.is_visit() && self.player.stamp() != self.kept_stamp;
        let place = waits.then(|| SETTLES_MS.saturating_sub(self.still_ms));
        let wishes = self.wishes_wait_ms.map(|waits| WISHES_SETTLE_MS.saturating_sub(waits));
        place.into_iter().chain(wishes).min().map(|ms| ms.max(100))
    }

    fn keep_where(&mut self, left_alone: bool) {
        self.kept_stamp = self.player.stamp();
        self.settings.whereabouts = Some(self.player.whereabouts());
        self.settings.left_alone = left_alone;
        self.settings.place.clone_from(&self.place);
        self.keep_settings();
    }

    fn keep_settings(&mut self) {
        self.wishes_wait_ms = None;
        let note = self.keep.as_mut().and_then(|keep| keep.keep_settings(&self.settings));
        self.note(note);
    }

    fn keep_tally(&mut self) {
        (self.tally_waits, self.since_tally_ms) = (false, 0);
        let note = self.keep.as_mut().and_then(|keep| keep.keep_tally(&self.tally));
        // What could not be written now is tried again in ten minutes.
        self.tally_waits = self.keep.as_ref().is_some_and(|keep| keep.troubles().next().is_some());
        self.note(note);
    }

    fn note(&self, note: Option<Note>) {
        if let Some(note) = note {
            log(note_words(&note, &self.words));
        }
    }

    /// Everything goes to the card, and the program ends.
    pub(super) fn end(&mut self) {
        if self.kiosk.is_visit() {
            self.keep_where(false);
        } else if self.wishes_wait_ms.is_some() {
            self.keep_settings();
        }
        self.keep_guesses();
        self.keep_tally();
        self.watchdog.stopping();
        self.has_ended = true;
    }
}
