//! Where a room is in a lesson, and what each group has guessed: a value of fixed size, without words or water.
//!
//! A step goes prompt → guess → reveal → talk → next step; what a step does not have is left out. The reveal of a step
//! with a guess comes only after a guess is in, or after it was skipped on purpose; from then on its guesses are closed.
//! Nothing here knows a language, so that a change of language leaves everything as it is. The value can be kept as it is
//! and taken up again after a power cut ([`Progress::resume`]).

use heapless::Vec as FixedVec;
use serde::{Deserialize, Serialize};

use super::script::{Guess, Lesson, MOST_STEPS, Shows, Step};
use super::spread::guess_spread;
use super::word::{WordFault, guess_of_word, word_of_guess};
use crate::water::dials::{DIALS, Dial, DialRange, Dials};

/// Most groups that guess.
pub const MOST_GROUPS: usize = 12;
/// Most guesses that are kept: one for every group and step.
pub const MOST_KEPT: usize = MOST_GROUPS * MOST_STEPS;

/// A part of a step.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Serialize, Deserialize)]
#[serde(rename_all = "snake_case")]
pub enum Phase {
    /// The room reads what it is about.
    Prompt,
    /// The groups guess.
    Guess,
    /// The result is shown.
    Reveal,
    /// The presenter talks.
    Talk,
}

/// What a group guessed in a step.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct GroupGuess {
    /// The step, counted from 0.
    pub step: u8,
    /// The group, counted from 0.
    pub group: u8,
    /// The stop of the guess, see [`Guess::value`].
    pub stop: u8,
}

/// What became of a wish to go on, to go back or to guess.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Moved {
    /// It was done.
    Done,
    /// The last step is over.
    AtEnd,
    /// This is the first page.
    AtStart,
    /// Nobody has guessed yet: guess, or skip on purpose.
    NeedsGuess,
    /// The result was shown already, so that the guesses are closed.
    Closed,
    /// This is no page for that.
    NotHere,
}

/// How the instrument stands in a phase of a step.
#[derive(Clone, Debug, PartialEq)]
pub struct Stage {
    /// What is shown behind the words.
    pub shows: Shows,
    /// The year, counted from 0.
    pub year: usize,
    /// Where every dial stands.
    pub dials: Dials,
    /// The dials that may be offered, with their limits. A dial that the lesson set and does not let the room turn has
    /// two places only: rest and where it was set.
    pub ranges: FixedVec<(Dial, DialRange), DIALS>,
    /// Whether the result must not be seen yet.
    pub hides_result: bool,
}

/// Where a room is, and its guesses.
#[derive(Clone, Debug, PartialEq, Eq, Serialize, Deserialize)]
pub struct Progress {
    /// The steps so far; the last is the present one.
    path: FixedVec<u8, MOST_STEPS>,
    phase: Phase,
    groups: u8,
    /// The group that guesses now.
    group: u8,
    /// Where the knob stands.
    hand: u8,
    guesses: FixedVec<GroupGuess, MOST_KEPT>,
    /// Steps whose guess was skipped on purpose, a bit each.
    skipped: u32,
    /// Steps whose result was shown, a bit each.
    revealed: u32,
}

const _: () = assert!(MOST_STEPS <= 32);

impl Progress {
    /// The first page, for so many groups; at least one group, at most [`MOST_GROUPS`] (`None` beyond).
    pub fn new(lesson: &Lesson, groups: u8) -> Option<Self> {
        if groups == 0 || usize::from(groups) > MOST_GROUPS || lesson.steps.is_empty() {
            return None;
        }
        let mut path = FixedVec::new();
        path.push(0).ok()?;
        let guesses = FixedVec::new();
        Some(Self { path, phase: Phase::Prompt, groups, group: 0, hand: 0, guesses, skipped: 0, revealed: 0 })
    }

    /// Takes up what was kept, if it fits the lesson: after a power cut, or with a file that was changed meanwhile.
    pub fn resume(self, lesson: &Lesson) -> Option<Self> {
        let steps = &lesson.steps;
        let follows = |pair: &[u8]| {
            steps.get(usize::from(pair[0])).is_some_and(|step| {
                let next = Some(usize::from(pair[1]));
                step.then == next || step.guess.is_some_and(|guess| guess.if_far == next)
            })
        };
        let step = steps.get(usize::from(*self.path.last()?))?;
        let groups_fit = self.groups > 0 && usize::from(self.groups) <= MOST_GROUPS && self.group < self.groups;
        let guesses_fit = self.guesses.iter().enumerate().all(|(index, kept)| {
            let guess = steps.get(usize::from(kept.step)).and_then(|step| step.guess);
            let again = self.guesses[..index].iter().any(|other| (other.step, other.group) == (kept.step, kept.group));
            !again && kept.group < self.groups && guess.is_some_and(|guess| kept.stop < guess.stops)
        });
        let hand_fits = self.phase != Phase::Guess || step.guess.is_some_and(|guess| self.hand < guess.stops);
        let may_reveal = self.phase < Phase::Reveal || step.guess.is_none() || self.is_revealed(self.step());
        let no_beyond = [self.skipped, self.revealed].iter().all(|bits| u64::from(*bits) >> steps.len() == 0);
        let open = (0..steps.len())
            .all(|index| !self.is_revealed(index) || self.is_skipped(index) || self.guesses_of(index).next().is_some());
        let fits = self.path.first() == Some(&0)
            && self.path.windows(2).all(follows)
            && has(step, self.phase)
            && groups_fit
            && guesses_fit
            && hand_fits
            && may_reveal
            && no_beyond
            && open;
        fits.then_some(self)
    }

    /// Forgets all guesses and begins again, for the next room; the number of groups stays.
    pub fn reset(&mut self) {
        self.path.truncate(1);
        self.phase = Phase::Prompt;
        (self.group, self.hand) = (0, 0);
        self.guesses.clear();
        (self.skipped, self.revealed) = (0, 0);
    }

    /// The present step, counted from 0.
    pub fn step(&self) -> usize {
        self.path.last().map_or(0, |step| usize::from(*step))
    }

    /// The present part of it.
    pub fn phase(&self) -> Phase {
        self.phase
    }

    /// How many groups there are.
    pub fn groups(&self) -> u8 {
        self.groups
    }

    /// The group that guesses now, counted from 0.
    pub fn group(&self) -> u8 {
        self.group
    }

    /// The stop where the knob stands while a group guesses.
    pub fn hand(&self) -> u8 {
        self.hand
    }

    /// The guesses of a step, in the order in which they came.
    pub fn guesses_of(&self, step: usize) -> impl Iterator<Item = GroupGuess> + '_ {
        self.guesses.iter().copied().filter(move |guess| usize::from(guess.step) == step)
    }

    /// Whether the guess of a step was skipped on purpose.
    pub fn is_skipped(&self, step: usize) -> bool {
        step < MOST_STEPS && self.skipped >> step & 1 == 1
    }

    /// Whether the result of a step has been shown.
    pub fn is_revealed(&self, step: usize) -> bool {
        step < MOST_STEPS && self.revealed >> step & 1 == 1
    }

    /// Goes on to the next page. `result` is what came out of the present step, where the host has it: after a guess that
    /// was not close a lesson may go another way.
    pub fn forward(&mut self, lesson: &Lesson, result: Option<f64>) -> Moved {
        let Some(step) = lesson.steps.get(self.step()) else { return Moved::NotHere };
        match self.phase {
            Phase::Prompt if step.guess.is_some() => self.begin_guess(step),
            Phase::Guess if self.guesses_of(self.step()).next().is_none() && !self.is_skipped(self.step()) => {
                return Moved::NeedsGuess;
            }
            Phase::Prompt | Phase::Guess if step.reveal.is_some() => {
                if step.guess.is_some() {
                    self.revealed |= 1 << self.step();
                }
                self.phase = Phase::Reveal;
            }
            Phase::Prompt | Phase::Guess | Phase::Reveal if step.talk.is_some() => self.phase = Phase::Talk,
            _ => return self.next_step(step, result),
        }
        Moved::Done
    }

    /// Goes back a page. Guesses stay; a result that was shown stays known.
    pub fn back(&mut self, lesson: &Lesson) -> Moved {
        let Some(step) = lesson.steps.get(self.step()) else { return Moved::NotHere };
        if self.phase > Phase::Prompt {
            let before = [Phase::Reveal, Phase::Guess, Phase::Prompt];
            let Some(phase) = before.into_iter().find(|phase| *phase < self.phase && has(step, *phase)) else {
                return Moved::NotHere;
            };
            self.phase = phase;
            if phase == Phase::Guess {
                self.begin_guess(step);
            }
            return Moved::Done;
        }
        if self.path.len() < 2 {
            return Moved::AtStart;
        }
        self.path.pop();
        let Some(step) = lesson.steps.get(self.step()) else { return Moved::NotHere };
        let last = [Phase::Talk, Phase::Reveal, Phase::Prompt].into_iter().find(|phase| has(step, *phase));
        self.phase = last.unwrap_or(Phase::Prompt);
        Moved::Done
    }

    /// Turns the knob by so many stops while a group guesses; it stops at its ends.
    pub fn turn(&mut self, lesson: &Lesson, by: i32) -> Moved {
        let guess = match self.open_guess(lesson) {
            Ok(guess) => guess,
            Err(moved) => return moved,
        };
        let wanted = i32::from(self.hand).saturating_add(by);
        let last = i32::from(guess.stops) - 1;
        self.hand = wanted.clamp(0, last) as u8;
        if wanted < 0 {
            Moved::AtStart
        } else if wanted > last {
            Moved::AtEnd
        } else {
            Moved::Done
        }
    }

    /// Hands the knob to another group.
    pub fn choose_group(&mut self, lesson: &Lesson, group: u8) -> Moved {
        if group >= self.groups {
            return Moved::NotHere;
        }
        match self.open_guess(lesson) {
            Ok(guess) => {
                self.take_hand(&guess, group);
                Moved::Done
            }
            Err(moved) => moved,
        }
    }

    /// Keeps the knob's place as the guess of the group at hand, in place of an earlier one, and hands the knob to the next
    /// group that has not guessed.
    pub fn put(&mut self, lesson: &Lesson) -> Moved {
        match self.open_guess(lesson) {
            Ok(guess) => {
                self.keep(self.group, self.hand);
                let waiting = (0..self.groups).find(|group| self.guess_of(*group).is_none());
                self.take_hand(&guess, waiting.unwrap_or(self.group));
                Moved::Done
            }
            Err(moved) => moved,
        }
    }

    /// Keeps the guess that a word from another board means.
    ///
    /// # Errors
    /// What is wrong with the word; [`WordFault::Nothing`] for a word of another step, of a group that is not there, or
    /// beyond the guess's last stop.
    pub fn put_word(&mut self, lesson: &Lesson, word: &str) -> Result<Moved, WordFault> {
        let said = guess_of_word(word, lesson.stamp)?;
        let guess = match self.open_guess(lesson) {
            Ok(guess) => guess,
            Err(moved) => return Ok(moved),
        };
        if usize::from(said.step) != self.step() || said.group >= self.groups || said.stop >= guess.stops {
            return Err(WordFault::Nothing);
        }
        self.keep(said.group, said.stop);
        if said.group == self.group {
            self.take_hand(&guess, said.group);
        }
        Ok(Moved::Done)
    }

    /// The word of a group's guess in the present step, for another board.
    pub fn word(&self, lesson: &Lesson, group: u8) -> Option<String> {
        word_of_guess(self.guess_of(group)?, lesson.stamp)
    }

    /// Shows the result without a guess, on purpose.
    pub fn skip(&mut self, lesson: &Lesson) -> Moved {
        if let Err(moved) = self.open_guess(lesson) {
            return moved;
        }
        self.skipped |= 1 << self.step();
        self.forward(lesson, None)
    }

    /// How the instrument stands now. While a result is hidden the dials stand as in the step before.
    pub fn stage(&self, lesson: &Lesson) -> Option<Stage> {
        let step = lesson.steps.get(self.step())?;
        let hides_result = step.guess.is_some() && self.phase < Phase::Reveal;
        let before = self.path.iter().rev().nth(1).and_then(|before| lesson.steps.get(usize::from(*before)));
        let dials = if hides_result { before.map_or(Dials::REST, |before| before.dials) } else { step.dials };
        let mut ranges = FixedVec::new();
        for dial in Dial::ALL {
            let allowed = step.allowed.iter().find(|allowed| allowed.dial == dial && !hides_result);
            let range = match (allowed, dials.get(dial)) {
                (Some(allowed), _) => Some(allowed.range),
                (None, Some(value)) if !dials.rests(dial) => Some(two_places(dial, value)),
                (None, _) => None,
            };
            if let Some(range) = range {
                // Each dial comes once, so that there is room.
                let _ = ranges.push((dial, range));
            }
        }
        Some(Stage { shows: step.shows, year: step.year, dials, ranges, hides_result })
    }

    /// The guess of the present step, if it can still be given.
    fn open_guess(&self, lesson: &Lesson) -> Result<Guess, Moved> {
        let guess = lesson.steps.get(self.step()).and_then(|step| step.guess);
        match guess {
            Some(guess) if self.phase == Phase::Guess => {
                if self.is_revealed(self.step()) {
                    Err(Moved::Closed)
                } else {
                    Ok(guess)
                }
            }
            _ => Err(Moved::NotHere),
        }
    }

    fn begin_guess(&mut self, step: &Step) {
        self.phase = Phase::Guess;
        if let Some(guess) = &step.guess {
            let waiting = (0..self.groups).find(|group| self.guess_of(*group).is_none());
            self.take_hand(guess, waiting.unwrap_or(0));
        }
    }

    fn take_hand(&mut self, guess: &Guess, group: u8) {
        self.group = group;
        self.hand = self.guess_of(group).map_or(guess.middle(), |kept| kept.stop);
    }

    fn guess_of(&self, group: u8) -> Option<GroupGuess> {
        self.guesses_of(self.step()).find(|guess| guess.group == group)
    }

    fn keep(&mut self, group: u8, stop: u8) {
        let kept = GroupGuess { step: self.step() as u8, group, stop };
        match self.guesses.iter_mut().find(|other| (other.step, other.group) == (kept.step, group)) {
            Some(other) => *other = kept,
            // One for every group and step: there is always room.
            None => {
                let _ = self.guesses.push(kept);
            }
        }
    }

    fn next_step(&mut self, step: &Step, result: Option<f64>) -> Moved {
        let far = step.guess.and_then(|guess| {
            let values = self.guesses_of(self.step()).filter_map(|kept| guess.value(kept.stop));
            let (middle, result) = (guess_spread(values, result)?.middle, result?);
            guess.if_far.filter(|_| !guess.is_near(middle, result))
        });
        let Some(next) = far.or(step.then) else { return Moved::AtEnd };
        // Steps lead down the file only, so that the path never outgrows the lesson.
        if self.path.push(next as u8).is_err() {
            return Moved::AtEnd;
        }
        self.phase = Phase::Prompt;
        Moved::Done
    }
}

/// Whether a step has a part.
fn has(step: &Step, phase: Phase) -> bool {
    match phase {
        Phase::Prompt => true,
        Phase::Guess => step.guess.is_some(),
        Phase::Reveal => step.reveal.is_some(),
        Phase::Talk => step.talk.is_some(),
    }
}

/// A range whose stops are rest and `value` only.
fn two_places(dial: Dial, value: f64) -> DialRange {
    let (least, most) = (value.min(0.0), value.max(0.0));
    if least < most {
        return DialRange { least, most, step: most - least };
    }
    // A starting storage of nothing: off lies below it, and the next stop above it has to be.
    let step = dial.widest().step;
    DialRange { least, most: least + step, step }
}
