//! The page at hand as plain data for the picture, in the reader's words. What must not be seen yet is not in it.

use super::sayings::{Sayings, in_units};
use super::{Choice, Led, Note, Part};
use crate::lesson::{Guess, GuessPage, Page, Phase, Quantity, Shape, WORD_LETTERS};
use crate::picture::views::lesson::{Axis, Body, Foot, GuessShown, LessonScene, RevealShown, Saying};
use crate::picture::views::wording::dial_name;
use crate::place::Text;
use crate::words::{System, Words};

/// The reader's languages and units.
#[derive(Clone, Copy)]
pub struct Voices<'a> {
    /// The first language.
    pub words: &'a Words,
    /// The second, where two are spoken.
    pub second: Option<&'a Words>,
    /// Units.
    pub system: System,
}

impl Voices<'_> {
    fn of(&self, text: &Text) -> Saying {
        let said = |words: &Words| in_units(text.get(words.tag()), self.system, words);
        Saying { first: said(self.words), second: self.second.map(said) }
    }

    fn say(&self, message: &str) -> Saying {
        Saying { first: self.words.say(message, &[]), second: self.second.map(|words| words.say(message, &[])) }
    }
}

impl Led {
    /// The page at hand.
    pub fn scene(&self, voices: Voices<'_>) -> LessonScene {
        let words = voices.words;
        let (title, body) = match (self.part, &self.course, self.page()) {
            (Part::Start, Some(course), _) => {
                let minutes = words.say("lesson-minutes", &[("n", u32::from(course.lesson.minutes).into())]);
                let about = voices.of(&course.lesson.text);
                let ask = words.say("lesson-groups", &[("n", u32::from(self.groups).into())]);
                (course.lesson.name.get(words.tag()), Body::Start { about, minutes, ask, groups: self.groups })
            }
            (Part::Steps, Some(course), Some(page)) => (course.lesson.name.get(words.tag()), self.body(&page, voices)),
            (Part::Over, Some(course), _) => {
                (course.lesson.name.get(words.tag()), Body::Over { text: voices.say("lesson-over") })
            }
            _ => return self.list(words),
        };
        let (step, done) = match self.page().filter(|_| self.part == Part::Steps) {
            Some(page) => (page_step(&page, words), Some((page.step, page.steps))),
            None => (String::new(), None),
        };
        LessonScene { title: title.to_owned(), step, done, body, foot: self.foot(words) }
    }

    /// What the strip under a view says while it is looked at, the step, and how to go on.
    pub fn strip(&self, voices: Voices<'_>) -> Option<(Saying, String, String)> {
        if !self.is_looking() {
            return None;
        }
        let page = self.page()?;
        let step = words_of_step(page.step, page.steps, voices.words);
        Some((voices.of(page.reveal.unwrap_or(page.prompt)), step, voices.words.say("lesson-hint-look", &[])))
    }

    fn page(&self) -> Option<Page<'_>> {
        let (course, progress) = (self.course.as_ref()?, self.progress.as_ref()?);
        Page::of(&course.lesson, progress, course.results.get(progress.step()).copied().flatten())
    }

    fn list(&self, words: &Words) -> LessonScene {
        let tag = words.tag();
        let entry = |entry: &super::ShelfEntry| (entry.name.get(tag).to_owned(), entry.text.get(tag).to_owned());
        LessonScene {
            title: words.say("lesson-list", &[]),
            step: String::new(),
            done: None,
            body: Body::List { entries: self.shelf.iter().map(entry).collect(), open: self.entry },
            foot: self.foot(words),
        }
    }

    fn body(&self, page: &Page<'_>, voices: Voices<'_>) -> Body {
        let words = voices.words;
        if let Some(word) = &self.word {
            return Body::Word {
                ask: words.say("lesson-word-ask", &[]),
                typed: word.typed().collect(),
                hand: word.at_hand(),
                letters: WORD_LETTERS,
            };
        }
        let guess = self.step().and_then(|step| step.guess);
        match (page.phase, &page.guess, guess, page.talk) {
            (Phase::Guess, Some(shown), Some(guess), _) => Body::Guess(self.guess(page, shown, &guess, voices)),
            (Phase::Reveal, Some(shown), Some(guess), _) => Body::Reveal(self.reveal(page, shown, &guess, voices)),
            (Phase::Talk, _, _, Some(talk)) => Body::Talk {
                kicker: words.say("lesson-for-leader", &[]),
                prompt: voices.of(page.prompt).first,
                talk: voices.of(talk),
            },
            _ => {
                let prompt = voices.of(page.reveal.unwrap_or(page.prompt));
                Body::Prompt { prompt, hint: self.hint(words) }
            }
        }
    }

    fn step(&self) -> Option<&crate::lesson::Step> {
        self.course.as_ref()?.lesson.steps.get(self.progress.as_ref()?.step())
    }

    /// What comes after the prompt: a guess, or a look with a dial to turn.
    fn hint(&self, words: &Words) -> String {
        let Some(step) = self.step() else { return String::new() };
        if step.guess.is_some() {
            return words.say("lesson-guess-first", &[]);
        }
        let names: Vec<String> = step.allowed.iter().map(|allowed| dial_name(allowed.dial, words)).collect();
        match names.as_slice() {
            [] => String::new(),
            names => words.say("lesson-may-turn", &[("dials", names.join(" · ").into())]),
        }
    }

    fn sayings<'a>(&'a self, guess: &'a Guess, words: &'a Words, system: System) -> Option<Sayings<'a>> {
        let course = self.course.as_ref()?;
        Some(Sayings { course, step: self.progress.as_ref()?.step(), guess, system, words })
    }

    fn axis(&self, guess: &Guess, voices: Voices<'_>) -> Axis {
        let Some(sayings) = self.sayings(guess, voices.words, voices.system) else {
            return Axis { title: String::new(), ticks: Vec::new(), rest: None };
        };
        let share = |value: f64| share_of(guess, value);
        let is_change = guess.reading.shape == Shape::Change && guess.least <= 0.0 && guess.most() >= 0.0;
        let rest = is_change.then(|| (share(0.0), voices.words.say("picture-as-it-was", &[])));
        let ticks = sayings.ticks().into_iter().map(|(value, text)| (share(value), text)).collect();
        Axis { title: sayings.title(), ticks, rest }
    }

    fn guess(&self, page: &Page<'_>, shown: &GuessPage, guess: &Guess, voices: Voices<'_>) -> GuessShown {
        let words = voices.words;
        let value = shown.hand.and_then(|hand| Some(self.sayings(guess, words, voices.system)?.value(hand)));
        GuessShown {
            prompt: voices.of(page.prompt),
            axis: self.axis(guess, voices),
            group: shown.group,
            group_name: group_name(shown.group, words),
            hand: shown.hand.map(|hand| share_of(guess, hand)).filter(|_| self.bar.is_none() && !self.is_closed()),
            value: value.unwrap_or_default(),
            is_in: shown.groups.iter().map(|group| group.is_in).collect(),
        }
    }

    fn reveal(&self, page: &Page<'_>, shown: &GuessPage, guess: &Guess, voices: Voices<'_>) -> RevealShown {
        let words = voices.words;
        let value =
            |value: f64| self.sayings(guess, words, voices.system).map_or(String::new(), |say| say.value(value));
        let share = |value: f64| share_of(guess, value);
        let guesses: Vec<(u8, f64)> = shown
            .groups
            .iter()
            .zip(0_u8..)
            .filter_map(|(group, index)| group.value.map(|value| (index, share(value))))
            .collect();
        let spread = shown.spread.filter(|spread| spread.guesses > 1);
        let usual =
            shown.usual.map(|usual| (share(usual), words.say("lesson-usual-value", &[("value", value(usual).into())])));
        RevealShown {
            reveal: voices.of(page.reveal.unwrap_or(page.prompt)),
            says: words.say("lesson-result", &[]),
            result_text: shown.result.map_or_else(|| words.say("lesson-nothing", &[]), value),
            axis: self.axis(guess, voices),
            result: shown.result.map(share),
            guesses,
            spread: spread.map(|spread| (share(spread.least), share(spread.middle), share(spread.most))),
            usual,
            verdict: self.verdict(shown, guess, voices),
        }
    }

    /// The guesses in a sentence.
    fn verdict(&self, shown: &GuessPage, guess: &Guess, voices: Voices<'_>) -> String {
        let words = voices.words;
        let value =
            |value: f64| self.sayings(guess, words, voices.system).map_or(String::new(), |say| say.in_sentence(value));
        let Some(spread) = shown.spread else { return words.say("lesson-skipped", &[]) };
        let Some(result) = shown.result else { return String::new() };
        let values = shown.groups.iter().filter_map(|group| group.value);
        let near = values.filter(|value| guess.is_near(*value, result)).count();
        if guess.reading.quantity() == Quantity::Canal {
            let count = [("n", (near as u32).into()), ("of", (spread.guesses as u32).into())];
            return words.say(if near == 0 { "lesson-none-right" } else { "lesson-right" }, &count);
        }
        if spread.least == spread.most {
            let one = [("guess", value(spread.least).into())];
            return words.say(if near > 0 { "lesson-verdict-one-near" } else { "lesson-verdict-one" }, &one);
        }
        let range = [("least", value(spread.least).into()), ("most", value(spread.most).into())];
        let near = match near {
            0 => words.say("lesson-none-near", &[]),
            near => words.say("lesson-near", &[("n", (near as u32).into())]),
        };
        format!("{} {near}", words.say("lesson-verdict", &range))
    }

    fn foot(&self, words: &Words) -> Foot {
        let choices = self.choices();
        let place = self.bar.unwrap_or(0);
        let named = |choice: &Choice| words.say(choice.message(), &[]);
        let mut choice = choices.get(place).map(|choice| (named(choice), place, choices.len()));
        let hint = match (self.part, &self.word) {
            (_, Some(_)) => {
                choice = None;
                "lesson-hint-word"
            }
            (Part::List, _) => "lesson-hint-list",
            (Part::Start, _) => "lesson-hint-start",
            _ if self.is_guessing() => "lesson-hint-guess",
            (Part::Steps, _) if self.phase() == Some(Phase::Guess) => "lesson-hint-choose",
            _ => "lesson-hint-on",
        };
        let hint_short = words.say(&format!("{hint}.short"), &[]);
        let note = self.note.map(|note| self.note_text(note, words));
        Foot { choice, hint: words.say(hint, &[]), hint_short, note }
    }

    fn note_text(&self, note: Note, words: &Words) -> String {
        let group = |group: u8| ("group", letter(group).to_string().into());
        match note {
            Note::NeedsGuess => words.say("lesson-needs-guess", &[]),
            Note::WrongWord => words.say("lesson-word-wrong", &[]),
            Note::WrongLetter => words.say("lesson-letter-wrong", &[]),
            Note::Cleared => words.say("lesson-cleared", &[]),
            Note::NotHere => words.say("lesson-not-here", &[]),
            Note::In(index) => {
                let word = self.course.as_ref().zip(self.progress.as_ref());
                match word.and_then(|(course, progress)| progress.word(&course.lesson, index)) {
                    Some(word) => words.say("lesson-in-word", &[group(index), ("word", word.into())]),
                    None => words.say("lesson-in", &[group(index)]),
                }
            }
        }
    }
}

/// The letter by which a group is known.
fn letter(group: u8) -> char {
    char::from(b'A' + group.min(25))
}

fn group_name(group: u8, words: &Words) -> String {
    words.say("lesson-group", &[("group", letter(group).to_string().into())])
}

fn page_step(page: &Page<'_>, words: &Words) -> String {
    words_of_step(page.step, page.steps, words)
}

fn words_of_step(step: usize, steps: usize, words: &Words) -> String {
    words.say("lesson-step", &[("step", (step as u32).into()), ("steps", (steps as u32).into())])
}

/// Where a value lies along the axis of a guess, 0 to 1 and a little beyond.
fn share_of(guess: &Guess, value: f64) -> f64 {
    let wide = guess.most() - guess.least;
    if wide > 0.0 { (value - guess.least) / wide } else { 0.5 }
}
