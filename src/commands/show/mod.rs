//! `show`: the running instrument on whatever screens are at hand, or as pictures in a folder.

mod board;
mod board_hands;
mod doubt;
mod drawing;
mod droughts;
mod hands;
mod kiosk;
mod leading;
mod mapping;
mod pictures;
mod player;
mod request;
pub(super) mod skill;

use clap::ArgMatches;

use super::failure::Failure;
use super::places;
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell;
use crate::board::choose::{Why, can_show, choose};
use crate::board::file::BoardFile;
use crate::board::surroundings::{Surroundings, WindowChance};
use crate::board::terminal::{Ability, Terminal};
use crate::board::{Choice, FrameSize, Instrument, Post, ScreenError, ScreenKind, Stage, run as play};
use crate::session::View;
use crate::words::Words;
pub(super) use board::read as read_board_file;
pub(super) use board_hands::{hand_name, parts, state_words};
use kiosk::KioskPlayer;
pub(super) use kiosk::note_words;
pub(super) use leading::LessonText;
pub(super) use player::Player;
pub(super) use request::{Request, groups};

/// Opens the place and shows it.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let request = Request::read(matches, &speech.words)?;
    if request.set_pin { kiosk::set_pin(&request, &speech.words) } else { show(speech, &request) }
}

/// What the program does when it is not told what to do: the usual place on the best screen at hand.
pub(super) fn usual(speech: &Speech) -> Result<(), Failure> {
    show(speech, &Request::default())
}

fn show(speech: &Speech, request: &Request) -> Result<(), Failure> {
    let words = &speech.words;
    let of_board = request.board.as_ref().map(BoardFile::screen_kinds).unwrap_or_default();
    let mut around = Surroundings::look(of_board);
    for &kind in &request.screens {
        can_show(kind, &around).map_err(|why| refuse(kind, why, words))?;
    }
    if request.screens.is_empty() {
        around.board_file.iter().try_for_each(|&kind| can_show(kind, &around)).map_err(|why| {
            let kind = around.board_file[0];
            refuse(kind, why, words)
        })?;
    }
    let player = open(speech, request)?;
    if !request.screens.is_empty() {
        return show_on(&request.screens, player, speech, request).map_err(|trouble| trouble.told(words));
    }
    let mut choice = choose(&around);
    if choice.kind == ScreenKind::Window {
        tell_choice(choice, words);
        match show_on(&[choice.kind], player, speech, request) {
            // A desktop that answers and still gives no window: the next best screen has its turn.
            Err(Trouble::Screen(error)) if error.screen == ScreenKind::Window => {
                super::tell_standard_error(&[screen_words(&error, words)]);
                around.window = WindowChance::Failed;
                choice = choose(&around);
            }
            outcome => return outcome.map_err(|trouble| trouble.told(words)),
        }
        return show_chosen(choice, open(speech, request)?, speech, request);
    }
    show_chosen(choice, player, speech, request)
}

fn show_chosen(choice: Choice, player: Player, speech: &Speech, request: &Request) -> Result<(), Failure> {
    tell_choice(choice, &speech.words);
    let of_board = request.board.as_ref().map(BoardFile::screen_kinds).unwrap_or_default();
    let screens = if of_board.is_empty() { vec![choice.kind] } else { of_board };
    show_on(&screens, player, speech, request).map_err(|trouble| trouble.told(&speech.words))?;
    // Whoever did not ask for pictures gets the answer in words as well.
    if choice.kind == ScreenKind::Pictures { tell::summary(speech, &request.place) } else { Ok(()) }
}

fn open(speech: &Speech, request: &Request) -> Result<Player, Failure> {
    let reading = speech.words.say("progress-reading", &[("path", request.place.display().to_string().into())]);
    let spinner = Spinner::start(reading);
    let opened = places::open_fitted(&request.place, speech)?;
    drop(spinner);
    let _spinner = Spinner::start(speech.words.say("progress-running", &[]));
    let mut player = Player::new(opened, speech, request.shade, request.units)?;
    if let Some(groups) = request.groups {
        player.ask_groups(groups);
    }
    if let Some(name) = &request.lesson {
        player.lead(&LessonText::find(name, &speech.words)?, speech)?;
    }
    Ok(player)
}

/// Why nothing is shown, or no longer.
enum Trouble {
    Screen(ScreenError),
    Told(Failure),
}

impl From<ScreenError> for Trouble {
    fn from(error: ScreenError) -> Self {
        Trouble::Screen(error)
    }
}

impl Trouble {
    fn told(self, words: &Words) -> Failure {
        match self {
            Trouble::Screen(error) => Failure::input(screen_words(&error, words)),
            Trouble::Told(failure) => failure,
        }
    }
}

fn show_on(screens: &[ScreenKind], player: Player, speech: &Speech, request: &Request) -> Result<(), Trouble> {
    let mut player = player;
    if screens.contains(&ScreenKind::Pictures) {
        pictures::write(&mut player, request, &speech.words).map_err(Trouble::Told)?;
    }
    let asked = |kind| screens.iter().filter(move |&&screen| screen == kind).count();
    let (windows, terminals) = (asked(ScreenKind::Window), asked(ScreenKind::Terminal));
    let on_board = screens.iter().any(|kind| matches!(kind, ScreenKind::Panel | ScreenKind::Framebuffer));
    if request.kiosk && (on_board || windows + terminals > 0) {
        let kiosk = KioskPlayer::new(player, request, speech.in_language(speech.words.tag()));
        return play_on(Stage::new(kiosk), screens, (windows, terminals), speech, request);
    }
    play_on(Stage::new(player), screens, (windows, terminals), speech, request)
}

/// Plays another instrument than the session on the screens asked for; `start_hands` starts the hands of the board.
pub(super) fn play_instrument<I: Instrument + 'static>(
    instrument: I,
    screens: &[ScreenKind],
    speech: &Speech,
    request: &Request,
    start_hands: StartHands<'_>,
) -> Result<(), Failure> {
    let asked = |kind| screens.iter().filter(move |&&screen| screen == kind).count();
    let counts = (asked(ScreenKind::Window), asked(ScreenKind::Terminal));
    play_with(Stage::new(instrument), screens, counts, speech, request, start_hands)
        .map_err(|trouble| trouble.told(&speech.words))
}

/// Starts the hands of a board, which put their events into a post.
pub(super) type StartHands<'a> = &'a dyn Fn(&Post);

fn play_on<I: Instrument + 'static>(
    stage: Stage<I>,
    screens: &[ScreenKind],
    counts: (usize, usize),
    speech: &Speech,
    request: &Request,
) -> Result<(), Trouble> {
    let start_hands = |post: &Post| {
        if let Some(board) = &request.board {
            board_hands::start(board, post, &speech.words);
        }
    };
    play_with(stage, screens, counts, speech, request, &start_hands)
}

fn play_with<I: Instrument + 'static>(
    mut stage: Stage<I>,
    screens: &[ScreenKind],
    (windows, terminals): (usize, usize),
    speech: &Speech,
    request: &Request,
    start_hands: StartHands<'_>,
) -> Result<(), Trouble> {
    let on_board = add_board_screens(&mut stage, screens, speech, request)?;
    if windows > 0 {
        return show_in_windows(stage, windows, terminals > 0, request.size, start_hands);
    }
    if terminals > 0 {
        let (post, hands) = Post::channel();
        stage.add(Box::new(terminal(None, request.size, &post)?));
        start_hands(&post);
        play(&mut stage, &hands)?;
    } else if on_board {
        let (post, hands) = Post::channel();
        start_hands(&post);
        play(&mut stage, &hands)?;
    }
    Ok(())
}

/// Adds the panels and monitors among `screens`; `true` where there are any.
fn add_board_screens<I: Instrument>(
    stage: &mut Stage<I>,
    screens: &[ScreenKind],
    speech: &Speech,
    request: &Request,
) -> Result<bool, ScreenError> {
    let any = [board::any_monitor()];
    let (parts, gpio_chip) = match &request.board {
        Some(file) => (file.screens.as_slice(), file.gpio_chip.as_str()),
        None => (any.as_slice(), ""),
    };
    let asked = parts.iter().filter(|part| screens.contains(&part.kind()));
    let opened = board::open(asked, gpio_chip, &speech.words)?;
    let on_board = !opened.is_empty();
    opened.into_iter().for_each(|screen| {
        stage.add(screen);
    });
    Ok(on_board)
}

#[cfg(feature = "window")]
fn show_in_windows<I: Instrument + 'static>(
    mut stage: Stage<I>,
    windows: usize,
    with_terminal: bool,
    size: Option<FrameSize>,
    start_hands: StartHands<'_>,
) -> Result<(), Trouble> {
    let desk = crate::board::window::Desk::open()?;
    start_hands(&desk.post());
    if with_terminal {
        // The terminal is the presenter's, the window the room's, each in its own size.
        stage.add(Box::new(terminal(None, None, &desk.post())?));
    }
    desk.run(stage, &vec![size; windows])?;
    Ok(())
}

#[cfg(not(feature = "window"))]
fn show_in_windows<I>(_: Stage<I>, _: usize, _: bool, _: Option<FrameSize>, _: StartHands<'_>) -> Result<(), Trouble> {
    Err(ScreenError::new(ScreenKind::Window, "not built").into())
}

fn terminal(ability: Option<Ability>, size: Option<FrameSize>, post: &Post) -> Result<Terminal, ScreenError> {
    let ability = ability.or_else(|| Ability::of_environment(|name| std::env::var(name).ok()));
    let ability = ability.ok_or_else(|| ScreenError::new(ScreenKind::Terminal, "TERM"))?;
    Terminal::open(ability, size, post)
}

/// The stable key of a view.
pub(super) fn view_key(view: View) -> &'static str {
    drawing::page(view).key()
}

fn tell_choice(choice: Choice, words: &Words) {
    let why = words.say(choice.why.message(), &[]);
    let name = words.say(screen_message(choice.kind), &[]);
    super::tell_standard_error(&[words.say("show-chosen", &[("screen", name.into()), ("why", why.into())])]);
}

fn refuse(kind: ScreenKind, why: Why, words: &Words) -> Failure {
    let why = words.say(why.message(), &[]);
    let name = words.say(screen_message(kind), &[]);
    Failure::input(words.say("show-cannot", &[("screen", name.into()), ("why", why.into())]))
}

fn screen_words(error: &ScreenError, words: &Words) -> String {
    let name = words.say(screen_message(error.screen), &[]);
    words.say("show-screen-failed", &[("screen", name.into()), ("reason", error.reason.as_str().into())])
}

fn screen_message(kind: ScreenKind) -> &'static str {
    match kind {
        ScreenKind::Panel => "show-screen-panel",
        ScreenKind::Framebuffer => "show-screen-framebuffer",
        ScreenKind::Window => "show-screen-window",
        ScreenKind::Terminal => "show-screen-terminal",
        ScreenKind::Pictures => "show-screen-pictures",
    }
}
