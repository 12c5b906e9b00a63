//! Typing the word of another board's guess, letter by letter: with keys, or with the one encoder and its button.

use heapless::Vec as FixedVec;

use crate::lesson::{WORD_LETTERS, word_letter, word_letters};

/// A word that is being typed.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct WordEntry {
    letters: FixedVec<u8, WORD_LETTERS>,
    /// The letter at hand, as a place in the list of those that can stand here.
    hand: usize,
}

impl WordEntry {
    /// The letters so far.
    pub fn typed(&self) -> impl Iterator<Item = char> + '_ {
        self.letters.iter().map(|letter| char::from(*letter))
    }

    /// The letter at hand; `None` once the word is whole.
    pub fn at_hand(&self) -> Option<char> {
        word_letters(self.letters.len()).get(self.hand).map(|letter| char::from(*letter))
    }

    /// Goes on through the letters that can stand here, round and round.
    pub(super) fn turn(&mut self, steps: i64) {
        self.hand = crate::session::knob::around(self.hand, word_letters(self.letters.len()).len(), steps);
    }

    /// Takes the letter at hand; gives the word once it is whole.
    pub(super) fn press(&mut self) -> Option<String> {
        let letter = *word_letters(self.letters.len()).get(self.hand)?;
        self.take(letter)
    }

    /// Takes a typed letter; `Err` where it cannot stand here.
    pub(super) fn letter(&mut self, typed: char) -> Result<Option<String>, ()> {
        let letter = word_letter(self.letters.len(), typed).ok_or(())?;
        Ok(self.take(letter))
    }

    /// Takes back the last letter; `false` where there is none.
    pub(super) fn back(&mut self) -> bool {
        self.hand = 0;
        self.letters.pop().is_some()
    }

    fn take(&mut self, letter: u8) -> Option<String> {
        // A whole word is taken away at once, so that there is always room.
        let _ = self.letters.push(letter);
        self.hand = 0;
        (self.letters.len() == WORD_LETTERS).then(|| self.typed().collect())
    }
}
