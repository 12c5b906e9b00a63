//! A guess as a short word that can be called across a room and typed into another board, without any network.
//!
//! A word is three syllables and a letter. The syllables hold the guess's stop, its step and its group,
//! one number below 64,000; the letter at the end checks them and the lesson. The number is stirred first, so that the
//! guesses of two groups do not look alike and a word does not give the guess away before the result is shown. It is
//! no secret.
//!
//! Ten consonants and four vowels make 40 syllables; they are letters that English and Spanish speakers tell apart by ear
//! (no *b* beside *v*, no *c*, *z* or *h*). One wrong letter, and two letters of one kind that changed places, are always
//! noticed: every letter counts with another weight modulo the prime 11.

use super::progress::{GroupGuess, MOST_GROUPS};
use super::script::{MOST_GUESS_STOPS, MOST_STEPS};

const CONSONANTS: &[u8; 10] = b"vdglmnrsty";
const VOWELS: &[u8; 4] = b"aeio";
const CHECKS: &[u8; 11] = b"vdglmnrstyk";
const SYLLABLES: u32 = 40;
const WORDS: u32 = SYLLABLES * SYLLABLES * SYLLABLES;
/// Has no factor in common with [`WORDS`], so that stirring can be undone.
const STIR: u64 = 27_449;
/// The inverse of [`STIR`] modulo [`WORDS`].
const SETTLE: u64 = 55_049;
const SHIFT: u64 = 12_345;

/// Letters of a word.
pub const WORD_LETTERS: usize = 7;

/// What is wrong with a word.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum WordFault {
    /// It has another number of letters; this many.
    Length(usize),
    /// This letter, counted from 1, is none that can stand there.
    Letter(usize),
    /// A letter is wrong, or it is a word of another lesson.
    Check,
    /// It means no guess.
    Nothing,
}

const _: () = assert!(MOST_GUESS_STOPS * MOST_STEPS * MOST_GROUPS <= WORDS as usize);
const _: () = assert!(STIR * SETTLE % WORDS as u64 == 1);

/// The letters that can stand at a place of a word, counted from 0; none beyond its end.
pub fn word_letters(place: usize) -> &'static [u8] {
    match place {
        0..WORD_LETTERS if place + 1 == WORD_LETTERS => CHECKS,
        0..WORD_LETTERS if place.is_multiple_of(2) => CONSONANTS,
        0..WORD_LETTERS => VOWELS,
        _ => &[],
    }
}

/// The letter of a word that a typed letter means at a place: capitals and accents do not matter, and *b* is *v*.
pub fn word_letter(place: usize, typed: char) -> Option<u8> {
    let letter = plain_letter(typed);
    word_letters(place).contains(&letter).then_some(letter)
}

/// The word of a guess in the lesson with this stamp; `None` for a guess that no lesson can have.
pub fn word_of_guess(guess: GroupGuess, stamp: u8) -> Option<String> {
    let (stop, step, group) = (usize::from(guess.stop), usize::from(guess.step), usize::from(guess.group));
    if stop >= MOST_GUESS_STOPS || step >= MOST_STEPS || group >= MOST_GROUPS {
        return None;
    }
    let plain = (stop * MOST_STEPS + step) * MOST_GROUPS + group;
    let mut stirred = ((plain as u64 * STIR + SHIFT) % u64::from(WORDS)) as u32;
    let mut places = [0_u8; WORD_LETTERS - 1];
    for pair in places.chunks_exact_mut(2) {
        let syllable = stirred % SYLLABLES;
        stirred /= SYLLABLES;
        pair[0] = (syllable / VOWELS.len() as u32) as u8;
        pair[1] = (syllable % VOWELS.len() as u32) as u8;
    }
    let mut word = String::with_capacity(WORD_LETTERS);
    for (index, place) in places.iter().enumerate() {
        let letters: &[u8] = if index % 2 == 0 { CONSONANTS } else { VOWELS };
        word.push(char::from(letters[usize::from(*place)]));
    }
    word.push(char::from(CHECKS[check(&places, stamp)]));
    Some(word)
}

/// The guess that a word means in the lesson with this stamp. Capitals, accents, blanks and hyphens do not matter, and *b*
/// is *v*, since many do not tell them apart.
///
/// # Errors
/// A [`WordFault`].
pub fn guess_of_word(word: &str, stamp: u8) -> Result<GroupGuess, WordFault> {
    let letters: Vec<u8> = word.chars().filter(|c| !c.is_whitespace() && *c != '-').map(plain_letter).collect();
    if letters.len() != WORD_LETTERS {
        return Err(WordFault::Length(letters.len()));
    }
    let mut places = [0_u8; WORD_LETTERS - 1];
    for (index, (place, letter)) in places.iter_mut().zip(&letters).enumerate() {
        let known: &[u8] = if index % 2 == 0 { CONSONANTS } else { VOWELS };
        let found = known.iter().position(|known| known == letter);
        *place = found.ok_or(WordFault::Letter(index + 1))? as u8;
    }
    let last = CHECKS.iter().position(|known| *known == letters[WORD_LETTERS - 1]);
    if last.ok_or(WordFault::Letter(WORD_LETTERS))? != check(&places, stamp) {
        return Err(WordFault::Check);
    }
    let mut stirred = 0_u64;
    for pair in places.chunks_exact(2).rev() {
        let syllable = u64::from(pair[0]) * VOWELS.len() as u64 + u64::from(pair[1]);
        stirred = stirred * u64::from(SYLLABLES) + syllable;
    }
    let words = u64::from(WORDS);
    let plain = ((stirred + words - SHIFT) % words * SETTLE % words) as usize;
    let (rest, group) = (plain / MOST_GROUPS, plain % MOST_GROUPS);
    let (stop, step) = (rest / MOST_STEPS, rest % MOST_STEPS);
    if stop >= MOST_GUESS_STOPS {
        return Err(WordFault::Nothing);
    }
    Ok(GroupGuess { step: step as u8, group: group as u8, stop: stop as u8 })
}

fn check(places: &[u8; WORD_LETTERS - 1], stamp: u8) -> usize {
    let sum: usize = places.iter().zip(1..).map(|(place, weight)| usize::from(*place) * weight).sum();
    (sum + usize::from(stamp)) % CHECKS.len()
}

fn plain_letter(letter: char) -> u8 {
    match letter.to_lowercase().next().unwrap_or(letter) {
        'á' => b'a',
        'é' => b'e',
        'í' => b'i',
        'ó' => b'o',
        'b' => b'v',
        letter if letter.is_ascii() => letter as u8,
        _ => b'?',
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn every() -> impl Iterator<Item = GroupGuess> {
        (0..MOST_GUESS_STOPS).step_by(7).flat_map(|stop| {
            (0..MOST_STEPS).step_by(5).flat_map(move |step| {
                (0..MOST_GROUPS).map(move |group| GroupGuess { step: step as u8, group: group as u8, stop: stop as u8 })
            })
        })
    }

    #[test]
    fn every_guess_comes_back_from_its_word() {
        let mut words = std::collections::BTreeSet::new();
        for guess in every() {
            let word = word_of_guess(guess, 4).unwrap();
            assert_eq!(word.len(), WORD_LETTERS);
            assert_eq!(guess_of_word(&word, 4), Ok(guess));
            let shouted = format!(" {}-{} ", word[..3].to_uppercase(), &word[3..]).replace('V', "B");
            assert_eq!(guess_of_word(&shouted, 4), Ok(guess));
            assert_eq!(guess_of_word(&word, 5), Err(WordFault::Check), "another lesson");
            words.insert(word);
        }
        assert_eq!(words.len(), every().count());
    }

    #[test]
    fn a_wrong_letter_and_a_swap_are_noticed() {
        for guess in every().step_by(11) {
            let word = word_of_guess(guess, 9).unwrap().into_bytes();
            for at in 0..WORD_LETTERS {
                for letter in b'a'..=b'z' {
                    let mut other = word.clone();
                    other[at] = letter;
                    let text = String::from_utf8(other.clone()).unwrap();
                    if other != word && !(word[at] == b'v' && letter == b'b') {
                        assert!(guess_of_word(&text, 9).is_err(), "{text}");
                    }
                }
            }
            for (one, two) in [(0, 2), (2, 4), (0, 4), (1, 3), (3, 5), (1, 5)] {
                let mut other = word.clone();
                other.swap(one, two);
                let text = String::from_utf8(other.clone()).unwrap();
                assert_eq!(guess_of_word(&text, 9).is_err(), other != word, "{text}");
            }
        }
    }

    #[test]
    fn what_is_no_word_is_told() {
        assert_eq!(guess_of_word("", 0), Err(WordFault::Length(0)));
        assert_eq!(guess_of_word("lamodetas", 0), Err(WordFault::Length(9)));
        assert_eq!(guess_of_word("xamodet", 0), Err(WordFault::Letter(1)));
        assert_eq!(guess_of_word("lamodeñ", 0), Err(WordFault::Letter(7)));
        let beyond = GroupGuess { step: 0, group: MOST_GROUPS as u8, stop: 0 };
        assert_eq!(word_of_guess(beyond, 0), None);
    }
}
