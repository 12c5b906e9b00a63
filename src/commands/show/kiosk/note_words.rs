//! What has to be said of kept files, in words.

use crate::commands::output::reason;
use crate::keep::{Damage, Kept, Note, Trouble};
use crate::words::Words;

/// A note as one line.
pub(in crate::commands) fn note_words(note: &Note, words: &Words) -> String {
    let what = |kept: Kept| ("what", words.say(&format!("keep-{}", kept.name()), &[]).into());
    let because = |trouble: &Trouble| ("reason", reason(&trouble.reason.into(), words).into());
    match note {
        Note::Damaged { kept, damage: Damage::Newer(_), .. } => words.say("keep-newer", &[what(*kept)]),
        Note::Damaged { kept, afresh: true, .. } => words.say("keep-damaged-afresh", &[what(*kept)]),
        Note::Damaged { kept, .. } => words.say("keep-damaged-last", &[what(*kept)]),
        Note::Unreadable(trouble) => words.say("keep-unreadable", &[what(trouble.kept), because(trouble)]),
        Note::CannotKeep(trouble) => words.say("keep-cannot", &[what(trouble.kept), because(trouble)]),
        Note::KeepsAgain(kept) => words.say("keep-again", &[what(*kept)]),
    }
}
