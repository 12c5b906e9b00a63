//! What events and commands do.

use super::command::Command;
use super::event::Event;
use super::keys::{Key, PAGE, command_of};
use super::knob::{Turn, around};
use super::offer::Offer;
use super::ring::Item;
use super::setting::{Setting, SettingEntry};
use super::state::{Act, Card, Done, Focus, State};
use super::view::View;
use crate::water::dials::Dials;

impl State {
    /// Takes an event.
    pub(super) fn apply(&mut self, event: Event, offer: &Offer) {
        // Time, a resting potentiometer and a finger on its way say nothing new about ends or turns by themselves.
        let goes_on = matches!(event, Event::Tick { .. } | Event::SetDial { .. } | Event::TouchMove(_));
        if !goes_on {
            (self.shown.at_end, self.shown.done) = (None, None);
        }
        self.turned = false;
        match event {
            Event::Turn { detents, since_ms } => self.turn(Turn { detents, since_ms }, offer),
            Event::Press => self.press(offer),
            Event::LongPress => self.reset(),
            Event::TurnDial { detents: 0, .. } => {}
            Event::TurnDial { dial, detents, since_ms } => self.turn_dial(dial, Turn { detents, since_ms }, offer),
            Event::SetDial { dial, share } => self.set_dial(dial, share, offer),
            Event::Key(key) => {
                if let Some(command) = self.along(key).or_else(|| command_of(key)) {
                    self.command(command, offer);
                }
            }
            Event::TouchDown(target) => self.touch_down(target, offer),
            Event::TouchMove(target) => self.touch_move(target, offer),
            Event::TouchUp(target) => self.touch_up(target, offer),
            Event::Command(command) => self.command(command, offer),
            Event::Tick { elapsed_ms } => self.tick(elapsed_ms, offer),
        }
        if !goes_on && !self.turned {
            self.gesture = None;
        }
    }

    /// What an arrow means where a list, the sheets of a card, the ring or a thing that is no dial is open: the way that it
    /// points.
    fn along(&self, key: Key) -> Option<Command> {
        let downwards = self.shown.card.is_some() || self.shown.focus == Focus::In(Item::Settings);
        let steps = match key {
            Key::Left => -1,
            Key::Right => 1,
            Key::Up if downwards => -1,
            Key::Down if downwards => 1,
            Key::PageUp if downwards => -PAGE,
            Key::PageDown if downwards => PAGE,
            _ => return None,
        };
        (downwards || !self.shown.focus.is_in_dial()).then_some(Command::Turn(steps))
    }

    /// Does what was asked.
    pub(super) fn command(&mut self, command: Command, offer: &Offer) {
        match command {
            Command::Turn(steps) => self.turn(Turn::plain(steps), offer),
            Command::Press => self.press(offer),
            Command::Close => self.close(),
            Command::StepDial(steps) => self.step_dial(steps.into(), offer),
            Command::DialToRest => {
                if let Some(dial) = self.shown.chosen {
                    self.gesture = None;
                    self.hold_dial(dial);
                    self.turn_to(dial, self.shown.dials.at_rest(dial));
                    self.gesture = None;
                }
            }
            Command::Choose(item) => self.choose(item, offer),
            Command::Show(view) => self.show(view, offer),
            Command::ShowNumber(number) => {
                if let Some(view) = offer.views().get(usize::from(number)) {
                    self.show(*view, offer);
                }
            }
            Command::Set(setting) => self.stand(setting, offer),
            Command::StepView(steps) => self.step_view(steps.into(), offer),
            Command::PlayOrPause if self.shown.playing => self.pause(),
            Command::PlayOrPause => self.play(offer),
            Command::StepDay(days) => self.step_day(days.into(), offer),
            Command::StepYear(years) => self.step_year(years.into(), offer),
            Command::NextThird => self.next_third(offer),
            Command::NextVoice => self.shown.voice = around(self.shown.voice, offer.voices().len(), 1),
            Command::OtherUnits => self.other_units(),
            Command::NextShade => self.step_shade(1),
            Command::Keep => self.keep(),
            Command::Undo => self.undo(offer),
            Command::Reset => self.reset(),
            Command::Settings => self.choose(Item::Settings, offer),
            Command::Words => self.explain(offer),
            Command::Help => {
                let open = matches!(self.shown.card, Some(Card::Help { .. }));
                self.shown.card = if open { None } else { Some(Card::Help { page: 0 }) };
            }
        }
    }

    /// The button: closes a card; in a thing, goes out to the ring; on the ring, goes in or acts.
    fn press(&mut self, offer: &Offer) {
        if self.shown.card.take().is_some() {
            return;
        }
        match self.shown.focus {
            Focus::In(Item::Settings) => self.do_entry(self.shown.entry, offer),
            Focus::In(item) => self.shown.focus = Focus::Ring(item),
            Focus::Ring(item) => self.choose(item, offer),
        }
    }

    /// Closes whatever is open over the dial in hand.
    fn close(&mut self) {
        if self.shown.card.take().is_none() {
            self.go_home();
        }
    }

    /// Back to the dial in hand.
    pub(super) fn go_home(&mut self) {
        self.shown.focus = Focus::In(self.shown.chosen.map_or(Item::View, Item::Dial));
    }

    /// Goes into a thing of the ring, or does it and goes back to the dial in hand.
    pub(super) fn choose(&mut self, item: Item, offer: &Offer) {
        self.shown.card = None;
        match item {
            Item::Dial(dial) if offer.scale(dial).is_none() => {}
            Item::Dial(dial) => self.hold_dial(dial),
            _ if !self.ring(offer).any(|other| other == item) => {}
            Item::Keep | Item::Undo | Item::Words | Item::Help => {
                self.go_home();
                match item {
                    Item::Keep => self.keep(),
                    Item::Undo => self.undo(offer),
                    Item::Words => self.explain(offer),
                    _ => self.shown.card = Some(Card::Help { page: 0 }),
                }
            }
            Item::Settings => {
                self.shown.entry = 0;
                self.shown.focus = Focus::In(item);
            }
            _ => self.shown.focus = Focus::In(item),
        }
    }

    fn step_dial(&mut self, steps: i64, offer: &Offer) {
        let count = offer.dials().count();
        let place = offer.dials().position(|dial| Some(dial) == self.shown.chosen).unwrap_or(0);
        if let Some(dial) = offer.dials().nth(around(place, count, steps)) {
            self.hold_dial(dial);
        }
    }

    /// Goes on through the views, sheet by sheet where a view has several.
    pub(super) fn step_view(&mut self, steps: i64, offer: &Offer) {
        let leaves = || {
            let sheets = |view: &View| (0..offer.sheets(*view)).map(|sheet| (*view, sheet)).collect::<Vec<_>>();
            offer.views().iter().flat_map(sheets)
        };
        let here = (self.shown.view, self.shown.sheet);
        let place = leaves().position(|leaf| leaf == here).unwrap_or(0);
        if let Some((view, sheet)) = leaves().nth(around(place, leaves().count(), steps)) {
            self.show(view, offer);
            self.shown.sheet = sheet;
        }
    }

    /// Shows a view, if it is offered, from its first sheet on; a card over the old one is closed.
    pub(super) fn show(&mut self, view: View, offer: &Offer) {
        if offer.views().contains(&view) {
            self.shown.view = view;
            self.shown.sheet = 0;
            self.shown.card = None;
            if self.shown.focus == Focus::In(Item::Settings) {
                self.go_home();
            }
            self.stay_on_ring(offer);
        }
    }

    /// Opens the first explanation, or closes the card if one is open.
    fn explain(&mut self, offer: &Offer) {
        let open = matches!(self.shown.card, Some(Card::Explain(_)));
        self.shown.card = if open { None } else { self.explanation(offer, 0).map(Card::Explain) };
    }

    fn keep(&mut self) {
        let (beside, done) = match self.shown.beside {
            Some(_) => (None, Done::LetGo),
            None => (Some(self.shown.dials), Done::Kept),
        };
        (self.shown.beside, self.shown.done) = (beside, Some(done));
    }

    fn reset(&mut self) {
        if self.shown.dials != Dials::REST || self.shown.beside.is_some() {
            self.remember(Act::Reset);
        }
        self.shown.done = Some(Done::Reset);
        self.shown.dials = Dials::REST;
        self.shown.beside = None;
        self.shown.card = None;
        self.hold = None;
        self.pause();
        self.go_home();
    }

    /// Takes back the last act by changing what it changed with what it was; the next undo changes it again.
    fn undo(&mut self, offer: &Offer) {
        let Some(undo) = self.shown.undo else {
            self.shown.done = Some(Done::NothingToUndo);
            return;
        };
        self.shown.done = Some(if undo.undone { Done::DoneAgain } else { Done::Undone });
        self.remember(undo.act);
        if let Some(again) = &mut self.shown.undo {
            again.undone = !undo.undone;
        }
        self.shown.dials = undo.dials;
        match undo.act {
            Act::Turn(_) => {}
            Act::Reset => self.shown.beside = undo.beside,
            Act::Recall => {
                self.set_year(undo.year, offer);
                self.shown.day = undo.day;
            }
        }
    }

    /// Does what an entry of the list of settings says.
    pub(super) fn do_entry(&mut self, entry: usize, offer: &Offer) {
        let own = &mut self.shown.own;
        let chosen = own.entry(offer, entry);
        let recalled = match chosen {
            None => return,
            Some(SettingEntry::Back) => None,
            Some(SettingEntry::Offered(index)) => offer.settings().get(index).map(|named| named.setting),
            Some(SettingEntry::Own(index)) => own.get(index),
            Some(SettingEntry::Save) => {
                own.push(Setting { dials: self.shown.dials, year: Some(self.shown.year) });
                self.shown.done = Some(Done::Saved(own.count() - 1));
                None
            }
            Some(SettingEntry::ForgetLast) => {
                own.pop();
                self.shown.done = Some(Done::Forgot);
                None
            }
        };
        if let Some(setting) = recalled {
            self.remember(Act::Recall);
            self.shown.done = chosen.map(Done::Recalled);
            self.shown.dials = setting.dials;
            if let Some(year) = setting.year {
                self.set_year(year, offer);
            }
        }
        self.shown.entry = 0;
        self.shown.card = None;
        self.go_home();
    }
}
