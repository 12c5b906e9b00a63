//! What a key, a button or a lesson can ask for.

use super::ring::Item;
use super::setting::Setting;
use super::view::View;

/// One thing that the session can be asked to do.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Command {
    /// Turn by that many steps, without acceleration: the chosen dial, or whatever is open.
    Turn(i32),
    /// Press the button.
    Press,
    /// Close the card or the ring.
    Close,
    /// Choose the dial that many further on.
    StepDial(i32),
    /// Bring the chosen dial back to rest.
    DialToRest,
    /// Go to a thing on the ring, or do it.
    Choose(Item),
    /// Show a view.
    Show(View),
    /// Show a view by its number in the offer, counted from 0.
    ShowNumber(u8),
    /// Show the view that many further on.
    StepView(i32),
    /// Stand as a lesson says: these dials and this year, with nothing to undo. What does not fit changes nothing.
    Set(Setting),
    /// Play the year, or pause it.
    PlayOrPause,
    /// Go that many days on.
    StepDay(i32),
    /// Go that many years on in the record.
    StepYear(i32),
    /// Go on to the next of dry, middling and wet.
    NextThird,
    /// Go on to the next language, or both at once.
    NextVoice,
    /// Change the units.
    OtherUnits,
    /// Go on to the next set of colours.
    NextShade,
    /// Keep what is dialled now beside what comes, or let it go.
    Keep,
    /// Take back the last turn, reset or recall; once more brings it again.
    Undo,
    /// Everything as it was.
    Reset,
    /// Open the list of settings.
    Settings,
    /// Explain the words of the view.
    Words,
    /// Open or close the help card.
    Help,
}
