//! The options of `map`, checked as far as that is possible without the place.

use std::path::PathBuf;

use clap::ArgMatches;

use super::refuse;
use crate::commands::failure::Failure;
use crate::commands::places;
use crate::commands::tell::dials::{offered, value_of};
use crate::commands::tell::years::read_years;
use crate::commands::usage::unknown_choice;
use crate::place::{DialPlan, Years};
use crate::water::dials::Dial;
use crate::whatif::{Axis, AxisFault, MOST_STOPS};
use crate::words::{System, Words};

/// The two sides where none are asked for; a place with a narrower range has all of that.
const USUAL_OVER: [&str; 2] = ["warming=0..6:0.5", "winter_precipitation=-20..20:5"];
/// What the map shows where nothing is asked for.
const USUAL_SIGN: &str = "supply_ratio";
/// The picture where no size is asked for, pixels.
const USUAL_SIZE: (u16, u16) = (800, 480);
/// The sides that a picture may have, pixels.
const SIDES: std::ops::RangeInclusive<u16> = 240..=4096;

/// How the map is written.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Form {
    /// A row for each cell.
    Csv,
    /// Everything.
    Json,
    /// A picture of this width and height, pixels.
    Png(u16, u16),
}

/// What is asked for.
pub(super) struct Request {
    /// The place.
    pub place: PathBuf,
    /// Every `--over`, as it was written.
    pub over: Vec<String>,
    /// The key of the reading.
    pub sign: String,
    /// The key of the canal.
    pub canal: Option<String>,
    /// Every `--set`, as it was written.
    pub set: Vec<String>,
    /// Which years, and as it was written.
    pub years: (Years, String),
    /// How the map is written.
    pub form: Form,
    /// Which part of how many.
    pub part: Option<(usize, usize)>,
    /// Parts to put together.
    pub merge: Vec<PathBuf>,
    /// Units of the picture; `None` leaves it to the place.
    pub units: Option<System>,
    /// Where the map goes.
    pub out: Option<PathBuf>,
}

impl Request {
    /// Reads the options.
    pub fn read(matches: &ArgMatches, words: &Words) -> Result<Self, Failure> {
        let text = |name: &str| matches.get_one::<String>(name).map(String::as_str);
        let texts = |name: &str| matches.get_many::<String>(name).into_iter().flatten().cloned().collect::<Vec<_>>();
        let path = |name: &str| matches.get_one::<PathBuf>(name).cloned();
        let size = text("size").map_or(Ok(USUAL_SIZE), |text| read_size(text, words))?;
        let form = match text("form") {
            None | Some("csv") => Form::Csv,
            Some("json") => Form::Json,
            Some("png") => Form::Png(size.0, size.1),
            Some(other) => {
                return Err(refuse(&unknown_choice("--form", other, &["csv", "json", "png"], words), words));
            }
        };
        let units = match text("units") {
            None => None,
            Some("metric") => Some(System::Metric),
            Some("us") => Some(System::Us),
            Some(other) => return Err(refuse(&unknown_choice("--units", other, &["metric", "us"], words), words)),
        };
        let years = text("years").unwrap_or("all");
        let request = Request {
            place: path("place").unwrap_or_else(|| places::USUAL.into()),
            over: texts("over"),
            sign: text("sign").unwrap_or(USUAL_SIGN).to_owned(),
            canal: text("canal").map(str::to_owned),
            set: texts("set"),
            years: (read_years(years, "map", words)?, years.to_owned()),
            form,
            part: text("part").map(|text| read_part(text, words)).transpose()?,
            merge: matches.get_many::<PathBuf>("merge").into_iter().flatten().cloned().collect(),
            units,
            out: path("out"),
        };
        let given = |name: &&&str| matches.value_source(name).is_some();
        if !request.merge.is_empty()
            && let Some(name) = ["over", "sign", "canal", "set", "years", "part"].iter().find(given)
        {
            let option = format!("--{name}");
            return Err(refuse(&words.say("error-merge-with", &[("option", option.into())]), words));
        }
        if request.part.is_some() && request.form != Form::Json {
            let arguments = [("option", "--part".into()), ("forms", "--form json".into())];
            return Err(refuse(&words.say("error-option-form", &arguments), words));
        }
        if matches!(request.form, Form::Png(..)) && request.out.is_none() {
            return Err(refuse(&words.say("error-png-out", &[]), words));
        }
        if request.over.len() != 2 && !request.over.is_empty() {
            return Err(refuse(&words.say("error-over-count", &[]), words));
        }
        Ok(request)
    }

    /// The two sides, as this place offers them; all that is wrong is told at once.
    pub fn axes(&self, plan: &DialPlan, words: &Words) -> Result<[Axis; 2], Failure> {
        let usual = USUAL_OVER.map(|text| match read_axis(text, plan, words) {
            Ok(_) => text.to_owned(),
            Err(_) => {
                let key = text.split('=').next().unwrap_or(text);
                let range = Dial::from_key(key).and_then(|dial| plan.range(dial));
                range.map_or(text.to_owned(), |range| format!("{key}={}..{}", range.least, range.most))
            }
        });
        let over = if self.over.is_empty() { &usual[..] } else { &self.over[..] };
        let read: Vec<Result<Axis, String>> = over.iter().map(|text| read_axis(text, plan, words)).collect();
        let wrong: Vec<&str> = read.iter().filter_map(|side| side.as_ref().err().map(String::as_str)).collect();
        if !wrong.is_empty() {
            return Err(refuse(&wrong.join("\n"), words));
        }
        let sides: Vec<Axis> = read.into_iter().flatten().collect();
        match <[Axis; 2]>::try_from(sides) {
            Ok([across, up]) if across.dial() == up.dial() => {
                Err(refuse(&words.say("error-over-same", &[("dial", up.dial().key().into())]), words))
            }
            Ok(axes) => Ok(axes),
            Err(_) => Err(refuse(&words.say("error-over-count", &[]), words)),
        }
    }
}

/// Reads `DIAL=FROM..TO:STEP`; without a step that of the dial is taken.
fn read_axis(text: &str, plan: &DialPlan, words: &Words) -> Result<Axis, String> {
    let unreadable = || words.say("error-over-unreadable", &[("text", text.into()), ("example", USUAL_OVER[0].into())]);
    let (key, span) = text.split_once('=').ok_or_else(unreadable)?;
    let (dial, range) = offered(key.trim(), plan, words)?;
    let (from, rest) = span.split_once("..").ok_or_else(unreadable)?;
    let (to, step) = match rest.split_once(':') {
        Some((to, step)) => {
            (to, step.trim().parse::<f64>().ok().filter(|step| step.is_finite()).ok_or_else(unreadable)?)
        }
        None => (rest, range.step),
    };
    let from = value_of(dial, range, from.trim(), words)?;
    let to = value_of(dial, range, to.trim(), words)?;
    let name = || ("dial", dial.key().into());
    let number = |name: &'static str, number: f64| (name, number.to_string().into());
    Axis::new(dial, from, to, step).map_err(|fault| match fault {
        AxisFault::NotFinite => unreadable(),
        AxisFault::Step => words.say("error-over-step", &[name()]),
        AxisFault::Backward => words.say("error-over-backward", &[name(), number("from", from), number("to", to)]),
        AxisFault::Misses(last) => {
            words.say("error-over-misses", &[name(), number("step", step), number("to", to), number("last", last)])
        }
        AxisFault::TooMany => words.say("error-over-many", &[name(), ("most", MOST_STOPS.into())]),
    })
}

fn read_part(text: &str, words: &Words) -> Result<(usize, usize), Failure> {
    let part = text.split_once('/').and_then(|(part, parts)| Some((part.parse().ok()?, parts.parse().ok()?)));
    part.filter(|(part, parts)| (1..=*parts).contains(part)).ok_or_else(|| {
        let arguments = [("text", text.into()), ("example", "2/8".into())];
        refuse(&words.say("error-part-unreadable", &arguments), words)
    })
}

fn read_size(text: &str, words: &Words) -> Result<(u16, u16), Failure> {
    let size = text.split_once('x').and_then(|(wide, high)| Some((wide.parse().ok()?, high.parse().ok()?)));
    size.filter(|(wide, high)| SIDES.contains(wide) && SIDES.contains(high)).ok_or_else(|| {
        let [low, high] = [SIDES.start(), SIDES.end()].map(|side| side.to_string().into());
        let arguments = [("text", text.into()), ("example", "800x480".into()), ("low", low), ("high", high)];
        refuse(&words.say("error-size-unreadable", &arguments), words)
    })
}
