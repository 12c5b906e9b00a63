//! Encoders and buttons on pins, through the character device of the GPIO chip.

use std::collections::BTreeMap;
use std::time::Duration;

use gpiocdev::Request;
use gpiocdev::line::{Bias, EdgeDetection, EdgeKind, Value, Values};
use rustix::time::{ClockId, clock_gettime};

use super::{Ended, HOLDER, Teller};
use crate::board::file::{ButtonPart, EncoderPart, Pin, Pull};
use crate::board::hands::button::{Button, ButtonTold, does};
use crate::board::hands::input::turned;
use crate::board::hands::quadrature::Quadrature;
use crate::board::hands::{HandState, Reading, Stuck, What, press};

/// Nothing is due: look again in so long all the same.
const LONG: Duration = Duration::from_secs(3600);
/// Edges that the kernel keeps while nobody reads.
const BUFFERED_EDGES: u32 = 512;

/// Lines of one hand, with what they read.
struct Lines {
    request: Request,
    chip: String,
    closed: BTreeMap<u16, bool>,
    next_number: Option<u32>,
}

/// The clock that the kernel stamps edges with.
fn now() -> Duration {
    let time = clock_gettime(ClockId::Monotonic);
    Duration::new(u64::try_from(time.tv_sec).unwrap_or(0), u32::try_from(time.tv_nsec).unwrap_or(0))
}

impl Lines {
    fn open(chip: &str, pins: &[Pin], pull: Pull) -> Result<Self, Ended> {
        let bias = match pull {
            Pull::Up => Bias::PullUp,
            Pull::Down => Bias::PullDown,
            Pull::OutsideUp | Pull::OutsideDown => Bias::Disabled,
        };
        let numbers: Vec<u32> = pins.iter().map(|pin| pin.0.into()).collect();
        let mut builder = Request::builder();
        builder.on_chip(chip).with_consumer(HOLDER).with_kernel_event_buffer_size(BUFFERED_EDGES);
        builder.with_lines(&numbers).as_input().with_bias(bias).with_edge_detection(EdgeDetection::BothEdges);
        if pull.closed_is_low() {
            builder.as_active_low();
        }
        let request = builder.request().map_err(|error| Ended::Lost(format!("{chip}: {error}")))?;
        let closed = pins.iter().map(|pin| (pin.0, false)).collect();
        let mut lines = Self { request, chip: chip.to_owned(), closed, next_number: None };
        lines.look()?;
        Ok(lines)
    }

    fn is_closed(&self, pin: Pin) -> bool {
        self.closed.get(&pin.0).copied().unwrap_or(false)
    }

    fn lost(&self, error: &gpiocdev::Error) -> Ended {
        Ended::Lost(format!("{}: {error}", self.chip))
    }

    /// Reads the lines as they are.
    fn look(&mut self) -> Result<(), Ended> {
        let mut values = Values::default();
        self.closed.keys().for_each(|pin| {
            values.set(u32::from(*pin), Value::Inactive);
        });
        self.request.values(&mut values).map_err(|error| self.lost(&error))?;
        for (pin, closed) in &mut self.closed {
            *closed = values.get(u32::from(*pin)) == Some(Value::Active);
        }
        Ok(())
    }

    /// Waits for an edge, no longer than until `due`, and gives its time; `None` where none came.
    fn wait(&mut self, due: Option<Duration>) -> Result<Option<Duration>, Ended> {
        let timeout = due.map_or(LONG, |due| due.saturating_sub(now()));
        if !self.request.wait_edge_event(timeout).map_err(|error| self.lost(&error))? {
            return Ok(None);
        }
        let edge = self.request.read_edge_event().map_err(|error| self.lost(&error))?;
        let missed = self.next_number.is_some_and(|number| number != edge.seqno);
        self.next_number = Some(edge.seqno.wrapping_add(1));
        if missed {
            // The kernel kept no more edges than it has room for: what counts is how the lines are now.
            self.look()?;
        } else if let Some(closed) = u16::try_from(edge.offset).ok().and_then(|pin| self.closed.get_mut(&pin)) {
            *closed = edge.kind == EdgeKind::Rising;
        }
        Ok(Some(Duration::from_nanos(edge.timestamp_ns)))
    }
}

pub(super) fn serve_button(part: &ButtonPart, gpio_chip: &str, teller: &Teller) {
    teller.keep_serving(&[0], || match button_while_there(part, gpio_chip, teller) {
        Ok(never) => match never {},
        Err(ended) => ended,
    });
}

/// A loop that only ends with a reason.
enum Never {}

fn button_while_there(part: &ButtonPart, gpio_chip: &str, teller: &Teller) -> Result<Never, Ended> {
    let mut lines = Lines::open(gpio_chip, &[part.pin], part.pull)?;
    let bounce = Duration::from_millis(part.bounce_ms.into());
    let mut button = Button::new(bounce, now(), lines.is_closed(part.pin));
    teller.try_tell(0, What::Is(HandState::There))?;
    teller.try_tell(0, What::Reads(Reading::Contact(lines.is_closed(part.pin))))?;
    loop {
        let told = match lines.wait(button.due())? {
            Some(at) => {
                let closed = lines.is_closed(part.pin);
                teller.try_tell(0, What::Reads(Reading::Contact(closed)))?;
                button.edge(at, closed)
            }
            None => button.time(now()),
        };
        let Some(told) = told else { continue };
        tell_health(0, told, teller)?;
        if let Some(event) = does(part.does, told) {
            teller.try_tell(0, What::Did(event))?;
        }
    }
}

fn tell_health(part: u8, told: ButtonTold, teller: &Teller) -> Result<(), Ended> {
    match told {
        ButtonTold::Stuck => teller.try_tell(part, What::Is(HandState::Stuck(Stuck::Button)))?,
        ButtonTold::Free => teller.try_tell(part, What::Is(HandState::There))?,
        ButtonTold::Down | ButtonTold::Up(_) => {}
    }
    Ok(())
}

pub(super) fn serve_encoder(part: &EncoderPart, gpio_chip: &str, teller: &Teller) {
    let parts: &[u8] = if part.button_pin.is_some() { &[0, 1] } else { &[0] };
    teller.keep_serving(parts, || match encoder_while_there(part, gpio_chip, teller) {
        Ok(never) => match never {},
        Err(ended) => ended,
    });
}

/// How long the button under a shaft may bounce; common practice, no source.
const SHAFT_BOUNCE: Duration = Duration::from_millis(15);

fn encoder_while_there(part: &EncoderPart, gpio_chip: &str, teller: &Teller) -> Result<Never, Ended> {
    let pins: Vec<Pin> = [part.a_pin, part.b_pin].into_iter().chain(part.button_pin).collect();
    let mut lines = Lines::open(gpio_chip, &pins, part.pull)?;
    let contacts = |lines: &Lines| (lines.is_closed(part.a_pin), lines.is_closed(part.b_pin));
    let (a, b) = contacts(&lines);
    let mut quadrature = Quadrature::new(part, a, b);
    let bounce = SHAFT_BOUNCE.max(Duration::from_millis(part.bounce_ms.into()));
    let mut button = part.button_pin.map(|pin| Button::new(bounce, now(), lines.is_closed(pin)));
    teller.try_tell(0, What::Is(HandState::There))?;
    teller.try_tell(0, What::Reads(Reading::Contacts(a, b)))?;
    if let Some(pin) = part.button_pin {
        teller.try_tell(1, What::Is(HandState::There))?;
        teller.try_tell(1, What::Reads(Reading::Contact(lines.is_closed(pin))))?;
    }
    let (mut read, mut was_silent) = ((a, b), false);
    loop {
        let due = quadrature.due().into_iter().chain(button.as_ref().and_then(Button::due)).min();
        let edge = lines.wait(due)?;
        let at = edge.unwrap_or_else(now);
        let (a, b) = contacts(&lines);
        let detents = if edge.is_some() { quadrature.edge(at, a, b) } else { quadrature.time(at) };
        if detents != 0 {
            teller.try_tell(0, What::Did(turned(part.turns, detents)))?;
        }
        if read != (a, b) {
            read = (a, b);
            teller.try_tell(0, What::Reads(Reading::Contacts(a, b)))?;
        }
        let is_silent = quadrature.is_one_contact_silent();
        if is_silent != was_silent {
            was_silent = is_silent;
            let state = if is_silent { HandState::Stuck(Stuck::OneContact) } else { HandState::There };
            teller.try_tell(0, What::Is(state))?;
        }
        if let (Some(button), Some(pin)) = (&mut button, part.button_pin) {
            let closed = lines.is_closed(pin);
            let told = if edge.is_some() { button.edge(at, closed) } else { button.time(at) };
            if let Some(told) = told {
                teller.try_tell(1, What::Reads(Reading::Contact(closed)))?;
                tell_health(1, told, teller)?;
                if let ButtonTold::Up(held) = told {
                    teller.try_tell(1, What::Did(press(held)))?;
                }
            }
        }
    }
}
