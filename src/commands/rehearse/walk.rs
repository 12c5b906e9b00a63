//! Walking through a lesson without a room: every page once, with guesses that lie apart.

use crate::lesson::{Guess, Phase};
use crate::session::lesson::{Led, Part};
use crate::session::{Command, Event};

/// Most pages of a walk; a lesson has far fewer.
const MOST_PAGES: usize = 400;

/// The guess that a group makes in a rehearsal, as a stop: what most people say first, the others all along the axis.
/// Where a lesson goes another way after a poor guess, all guess poorly, so that no step is left out.
fn stop_of(guess: &Guess, group: u8, groups: u8) -> u8 {
    let last = u32::from(guess.stops) - 1;
    if guess.if_far.is_some() {
        return last as u8;
    }
    let usual = guess.usual.filter(|_| group == 0);
    let usual = usual.and_then(|usual| (0..guess.stops).find(|stop| guess.value(*stop) == Some(usual)));
    usual.unwrap_or((last * (2 * u32::from(group) + 1) / (2 * u32::from(groups.max(1)))) as u8)
}

/// Goes from page to page by events; `step` takes an event, `look` gives the lesson as it stands, `picture` is called on
/// every page with its name.
pub(super) fn walk<T, E>(
    host: &mut T,
    step: impl Fn(&mut T, Event),
    look: impl Fn(&T) -> &Led,
    mut picture: impl FnMut(&mut T, &str) -> Result<(), E>,
) -> Result<(), E> {
    for _ in 0..MOST_PAGES {
        let led = look(host);
        match led.part() {
            Part::List => return Ok(()),
            Part::Over => return picture(host, "over"),
            Part::Start => picture(host, "start")?,
            Part::Steps => {
                let name = page_name(led);
                let guessing = guess_at_hand(led);
                let groups = led.groups();
                if let Some(guess) = guessing {
                    for group in 0..groups {
                        let Some(hand) = look(host).progress().map(|progress| progress.hand()) else { break };
                        let stop = stop_of(&guess, group, groups);
                        step(host, Event::Command(Command::Turn(i32::from(stop) - i32::from(hand))));
                        // The picture shows the last group at its guess, and the others in.
                        if group + 1 == groups {
                            picture(host, &name)?;
                        }
                        step(host, Event::Press);
                    }
                } else {
                    picture(host, &name)?;
                }
            }
        }
        step(host, Event::Press);
    }
    Ok(())
}

/// The key of the step and the part of it.
fn page_name(led: &Led) -> String {
    let progress = led.progress();
    let step = led.course().zip(progress).and_then(|(course, progress)| course.lesson.steps.get(progress.step()));
    let key = step.map_or("", |step| step.key.as_str());
    let part = match progress.map(|progress| progress.phase()) {
        _ if led.is_looking() => "look",
        Some(Phase::Guess) => "guess",
        Some(Phase::Reveal) => "reveal",
        Some(Phase::Talk) => "talk",
        Some(Phase::Prompt) | None => "prompt",
    };
    format!("{key}-{part}")
}

fn guess_at_hand(led: &Led) -> Option<Guess> {
    let progress = led.progress().filter(|progress| progress.phase() == Phase::Guess)?;
    led.course()?.lesson.steps.get(progress.step())?.guess
}
