//! Fingers: a tap chooses, a drag turns a dial or moves the day.

use super::event::Target;
use super::offer::Offer;
use super::state::{Card, Explained, Hold, State};
use super::year::YearChoice;
use crate::water::dials::Dial;

impl State {
    /// A finger goes down. Under an open card only its buttons and its words are there; a tap anywhere else closes it.
    pub(super) fn touch_down(&mut self, target: Target, offer: &Offer) {
        let covered = self.shown.card.is_some() && !matches!(target, Target::Button(_) | Target::Term(_));
        let target = if covered { Target::Card } else { target };
        self.hold = Some(match target {
            Target::Dial { dial, share } => match offer.scale(dial) {
                Some(scale) if share.is_finite() => {
                    self.hold_dial(dial);
                    Hold::Dial { dial, share, stop: scale.stop_at(self.shown.dials.get(dial)) }
                }
                _ => Hold::Other(Target::Nothing),
            },
            Target::Day(day) => {
                self.set_day(day, offer);
                Hold::Day
            }
            other => Hold::Other(other),
        });
    }

    /// A finger moves: what it holds follows.
    pub(super) fn touch_move(&mut self, target: Target, offer: &Offer) {
        match (self.hold, target) {
            (Some(Hold::Dial { dial, share, stop }), Target::Dial { dial: over, share: now }) if dial == over => {
                self.drag(dial, stop, now - share, offer);
            }
            (Some(Hold::Day), Target::Day(day)) => self.set_day(day, offer),
            _ => {}
        }
    }

    /// Moves a dial from `from` by a share of its way, so that it does not jump when it is taken in hand off its mark.
    fn drag(&mut self, dial: Dial, from: usize, by_share: f64, offer: &Offer) {
        let Some(scale) = offer.scale(dial) else { return };
        if !by_share.is_finite() {
            return;
        }
        let last = (scale.stops() - 1) as f64;
        // Whatever goes beyond the ends is cut here, where a number too large for counting could come in.
        let steps = libm::round((by_share * last).clamp(-last - 1.0, last + 1.0)) as i64;
        let (stop, end) = super::knob::along(from, scale.stops(), steps);
        self.shown.at_end = end;
        // A finger that has not left its stop leaves a value between two stops alone.
        if steps != 0 || self.gesture == Some(dial) {
            self.turn_to(dial, scale.set(self.shown.dials, stop));
        }
    }

    /// A finger is lifted: a tap counts where it ends on what it began on.
    pub(super) fn touch_up(&mut self, target: Target, offer: &Offer) {
        let covered = self.shown.card.is_some() && !matches!(target, Target::Button(_) | Target::Term(_));
        let target = if covered { Target::Card } else { target };
        match self.hold.take() {
            Some(Hold::Other(began)) if began == target => {}
            _ => return,
        }
        match target {
            Target::Year(index) => self.set_year(YearChoice::Any(index), offer),
            Target::View(view) => self.show(view, offer),
            Target::Item(item) => self.choose(item, offer),
            Target::Setting(entry) => self.do_entry(entry, offer),
            Target::Term(term) if term < offer.terms(self.shown.view) => {
                self.shown.card = Some(Card::Explain(Explained::Term(term)));
            }
            Target::Button(command) => self.command(command, offer),
            Target::Card => self.shown.card = None,
            Target::Term(_) | Target::Dial { .. } | Target::Day(_) | Target::Nothing => {}
        }
    }
}
