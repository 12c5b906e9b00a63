//! Input devices of the kernel, found by name, unplugged and plugged in again.

use std::collections::BTreeSet;
use std::fs;
use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex, PoisonError};
use std::time::{Duration, Instant};

use evdev::raw_stream::RawDevice;
use evdev::{AbsoluteAxisCode, KeyCode, RelativeAxisCode};
use rustix::event::{PollFd, PollFlags, Timespec, poll};

use super::{AGAIN, Ended, Teller};
use crate::board::file::{BoardFile, HandPart, InputDevicePart, ScreenPart, TouchscreenPart};
use crate::board::hands::input::{Abilities, Ask, InputDecoder, RawInput};
use crate::board::hands::key_codes::LETTERS;
use crate::board::hands::touch::{TouchAbilities, TouchDecoder};
use crate::board::hands::{HandEvent, HandState, Stuck, What};
use crate::board::placing::Placing;

/// Where the kernel tells the names of its input devices, for all to read.
const NAMES: &str = "/sys/class/input";
const DEVICES: &str = "/dev/input";
/// One device of the name is there; a keyboard that shows up as several may have more.
const LOOK_FOR_MORE: Duration = Duration::from_secs(15);
/// Pixels of a monitor whose mode the board file does not say.
const MONITOR: (u16, u16) = (1280, 720);

/// How the picture lies on the glass under a touchscreen.
pub(super) fn placing_of(board: &BoardFile, part: &HandPart) -> Option<Placing> {
    let HandPart::Touchscreen(touchscreen) = part else { return None };
    let ((width, height), turned) = match board.screens.get(touchscreen.screen)? {
        ScreenPart::Panel(panel) => ((panel.width_px, panel.height_px), panel.turned),
        ScreenPart::Monitor(monitor) => (monitor.mode_px.unwrap_or(MONITOR), monitor.turned),
    };
    Placing::new(width.into(), height.into(), turned)
}

pub(super) fn serve_knobs(part: &InputDevicePart, teller: &Teller) {
    let part_of_device = part.clone();
    serve(&part.name, teller, move |device, teller| knobs_while_there(&part_of_device, device, teller));
}

pub(super) fn serve_touch(part: &TouchscreenPart, placing: Option<Placing>, teller: &Teller) {
    let Some(placing) = placing else { return };
    let part_of_device = part.clone();
    serve(&part.name, teller, move |device, teller| touch_while_there(&part_of_device, placing, device, teller));
}

/// The devices whose name holds that text, by the files that stand for them.
fn find(name: &str) -> BTreeSet<PathBuf> {
    let named = |folder: PathBuf| {
        let node = folder.file_name()?.to_str()?.starts_with("event").then(|| folder.file_name())??;
        let is = fs::read_to_string(folder.join("device/name")).ok()?;
        is.contains(name).then(|| Path::new(DEVICES).join(node))
    };
    fs::read_dir(NAMES).into_iter().flatten().flatten().filter_map(|entry| named(entry.path())).collect()
}

/// Looks for devices of that name and gives each a thread that serves it.
fn serve<F>(name: &str, teller: &Teller, serve_one: F)
where
    F: Fn(&mut RawDevice, &Teller) -> Ended + Clone + Send + 'static,
{
    let open: Arc<Mutex<BTreeSet<PathBuf>>> = Arc::default();
    let is_heard = Arc::new(std::sync::atomic::AtomicBool::new(true));
    let mut told: Option<HandState> = None;
    while is_heard.load(std::sync::atomic::Ordering::Relaxed) {
        let mut reason = name.to_owned();
        for path in find(name) {
            if open.lock().unwrap_or_else(PoisonError::into_inner).contains(&path) {
                continue;
            }
            let mut device = match RawDevice::open(&path) {
                Ok(device) => device,
                Err(error) => {
                    reason = format!("{}: {error}", path.display());
                    continue;
                }
            };
            open.lock().unwrap_or_else(PoisonError::into_inner).insert(path.clone());
            let (open, teller, serve_one) = (Arc::clone(&open), teller.clone(), serve_one.clone());
            let is_heard = Arc::clone(&is_heard);
            let started = std::thread::Builder::new().name("input device".into()).spawn({
                let (open, path) = (Arc::clone(&open), path.clone());
                move || {
                    if let Ended::Unheard = serve_one(&mut device, &teller) {
                        is_heard.store(false, std::sync::atomic::Ordering::Relaxed);
                    }
                    open.lock().unwrap_or_else(PoisonError::into_inner).remove(&path);
                }
            });
            if started.is_err() {
                open.lock().unwrap_or_else(PoisonError::into_inner).remove(&path);
            }
        }
        let any = !open.lock().unwrap_or_else(PoisonError::into_inner).is_empty();
        let state = if any { HandState::There } else { HandState::Lost(reason) };
        if told.as_ref() != Some(&state) {
            if !teller.tell(0, What::Is(state.clone())) {
                return;
            }
            told = Some(state);
        }
        // A device that goes must be missed soon; one more of the same name is not urgent.
        let looked = Instant::now();
        while looked.elapsed() < if any { LOOK_FOR_MORE } else { AGAIN } {
            std::thread::sleep(AGAIN);
            if any && open.lock().unwrap_or_else(PoisonError::into_inner).is_empty() {
                break;
            }
        }
    }
}

/// Waits until the device has something to say; `false` where `timeout` comes first.
fn wait(device: &RawDevice, timeout: Option<Duration>) -> std::io::Result<bool> {
    let mut wanted = [PollFd::new(device, PollFlags::IN)];
    let timeout = timeout.map(|timeout| Timespec {
        tv_sec: i64::try_from(timeout.as_secs()).unwrap_or(i64::MAX),
        tv_nsec: timeout.subsec_nanos().into(),
    });
    match poll(&mut wanted, timeout.as_ref()) {
        Ok(ready) => Ok(ready > 0),
        Err(rustix::io::Errno::INTR) => Ok(false),
        Err(error) => Err(error.into()),
    }
}

/// What came, with the time of one clock that never goes back: the kernel's stamps follow the wall clock, which may jump.
fn read(device: &mut RawDevice, began: Instant) -> std::io::Result<Vec<RawInput>> {
    let at = began.elapsed();
    let raw = |event: evdev::InputEvent| RawInput {
        at,
        kind: event.event_type().0,
        code: event.code(),
        value: event.value(),
    };
    Ok(device.fetch_events()?.map(raw).collect())
}

fn tell_all(out: &mut Vec<HandEvent>, teller: &Teller) -> Result<(), Ended> {
    for event in out.drain(..) {
        teller.try_tell(0, What::Did(event))?;
    }
    Ok(())
}

fn lost(error: impl std::fmt::Display) -> Ended {
    Ended::Lost(error.to_string())
}

/// Where an absolute axis is, with its least and most.
fn axis(device: &RawDevice, code: AbsoluteAxisCode) -> Option<(i32, i32, i32)> {
    device.supported_absolute_axes().filter(|axes| axes.contains(code))?;
    let states = device.get_abs_state().ok()?;
    let state = states.get(usize::from(code.0))?;
    Some((state.value, state.minimum, state.maximum))
}

fn keys_down(device: &RawDevice) -> Vec<u16> {
    device.get_key_state().map(|keys| keys.iter().map(|key| key.0).collect()).unwrap_or_default()
}

fn knobs_while_there(part: &InputDevicePart, device: &mut RawDevice, teller: &Teller) -> Ended {
    let mut serve = || -> Result<(), Ended> {
        let has_key =
            |device: &RawDevice, code| device.supported_keys().is_some_and(|keys| keys.contains(KeyCode(code)));
        let has_axis = |code| device.supported_relative_axes().is_some_and(|axes| axes.contains(code));
        let place = axis(device, AbsoluteAxisCode::ABS_X);
        let abilities = Abilities {
            is_keyboard: has_key(device, LETTERS.0) && has_key(device, LETTERS.1),
            is_mouse: has_axis(RelativeAxisCode::REL_X) && has_axis(RelativeAxisCode::REL_Y),
            places: place.map(|(_, least, most)| (least, most)),
        };
        if !abilities.is_keyboard {
            // A button is often the power key to the kernel: a press must not put the board to sleep. Where the device cannot
            // be had alone, it is shared. Keyboards stay shared, so that whoever sits at one can end the program.
            let _ = device.grab();
        }
        let mut decoder = InputDecoder::new(part, abilities, place.map(|(at, ..)| at), &keys_down(device));
        let (began, mut out, mut is_stuck) = (Instant::now(), Vec::new(), false);
        loop {
            let stuck_at = decoder.stuck_at();
            let due = stuck_at.filter(|_| !is_stuck).map(|due| due.saturating_sub(began.elapsed()));
            if wait(device, due).map_err(lost)? {
                for raw in read(device, began).map_err(lost)? {
                    if decoder.event(raw, &mut out) == Ask::State {
                        let place = axis(device, AbsoluteAxisCode::ABS_X).map(|(at, ..)| at);
                        decoder.stands(place, &keys_down(device), &mut out);
                    }
                }
                tell_all(&mut out, teller)?;
            }
            let stuck = decoder.stuck_at().is_some_and(|due| due <= began.elapsed());
            if stuck != is_stuck {
                is_stuck = stuck;
                let state = if stuck { HandState::Stuck(Stuck::Button) } else { HandState::There };
                teller.try_tell(0, What::Is(state))?;
            }
        }
    };
    serve().err().unwrap_or(Ended::Unheard)
}

fn touch_while_there(part: &TouchscreenPart, placing: Placing, device: &mut RawDevice, teller: &Teller) -> Ended {
    let one_finger = axis(device, AbsoluteAxisCode::ABS_X).is_some()
        && device.supported_keys().is_some_and(|keys| keys.contains(KeyCode::BTN_TOUCH));
    let codes = match one_finger {
        true => [AbsoluteAxisCode::ABS_X, AbsoluteAxisCode::ABS_Y],
        false => [AbsoluteAxisCode::ABS_MT_POSITION_X, AbsoluteAxisCode::ABS_MT_POSITION_Y],
    };
    let ranges = codes.map(|code| axis(device, code).map_or((0, 0), |(_, least, most)| (least, most)));
    let mut decoder = TouchDecoder::new(part, TouchAbilities { one_finger, ranges }, placing);
    let (began, mut out) = (Instant::now(), Vec::new());
    let mut serve = || -> Result<(), Ended> {
        loop {
            for raw in read(device, began).map_err(lost)? {
                if decoder.event(raw, &mut out) == Ask::State {
                    let places = codes.map(|code| axis(device, code).map(|(at, ..)| at));
                    decoder.stands(keys_down(device).contains(&KeyCode::BTN_TOUCH.0), places, &mut out);
                }
            }
            tell_all(&mut out, teller)?;
        }
    };
    let ended = serve().err().unwrap_or(Ended::Unheard);
    decoder.lost(&mut out);
    // Where nobody listens any more, nobody misses it.
    let _ = tell_all(&mut out, teller);
    ended
}
