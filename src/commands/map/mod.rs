//! `map`: one number over every combination of two dials, whole or in parts.

mod picture;
mod request;
mod sheet;

use std::sync::atomic::{AtomicBool, AtomicUsize, Ordering};

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{check_target, deliver};
use super::places::{self, Opened};
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell::{dials, years, years_at_rest};
use super::usage::mistake;
use crate::place::Place;
use crate::signs::Reading;
use crate::water::dials::Dials;
use crate::whatif::{MOST_CELLS, Question, Source, WhatIfFault};
use crate::words::{Words, nearest};
use request::{Form, Request};
use sheet::{Part, Sheet, Side, YearsShown};

/// Makes the map, or puts its parts together, and writes it.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let request = Request::read(matches, &speech.words)?;
    check_target(request.out.as_deref(), &speech.words)?;
    let Opened { place, fit } = {
        let path = request.place.display().to_string();
        let _spinner = Spinner::start(speech.words.say("progress-reading", &[("path", path.into())]));
        places::open_fitted(&request.place, speech)?
    };
    let words = speech.for_place(&place.region);
    let sheet =
        if request.merge.is_empty() { make(&request, &place, &words)? } else { merged(&request, &place, &words)? };
    let answer = match request.form {
        Form::Csv => sheet.to_csv().into_bytes(),
        Form::Json => sheet.to_json().into_bytes(),
        Form::Png(wide, high) => {
            let reading = reading(&sheet.sign, sheet.canal.as_deref(), &place, &words)?;
            picture::png(&sheet, reading, &place, request.units, (wide, high), fit.as_ref(), &words)?
        }
    };
    deliver(&answer, request.out.as_deref(), &words)
}

fn merged(request: &Request, place: &Place, words: &Words) -> Result<Sheet, Failure> {
    let sheet = sheet::merge(&request.merge, words)?;
    let name = place.name.get("en");
    if sheet.place != name {
        let arguments = [("found", sheet.place.as_str().into()), ("place", name.into())];
        return Err(Failure::input(words.say("error-merge-place", &arguments)));
    }
    Ok(sheet)
}

/// Runs the cells that are asked for.
fn make(request: &Request, place: &Place, words: &Words) -> Result<Sheet, Failure> {
    let axes = request.axes(&place.dials, words)?;
    let reading = reading(&request.sign, request.canal.as_deref(), place, words)?;
    let base = dials::turn(Dials::REST, &request.set, &place.dials, "map", words)?;
    let spinner = Spinner::start(words.say("progress-running", &[]));
    let at_rest = years_at_rest(place, words)?;
    let shown = years::chosen(request.years.0, &at_rest, "map", words)?;
    let rest: Vec<_> = shown.iter().filter_map(|index| at_rest.get(*index)).collect();
    let unbroken = rest.windows(2).all(|pair| pair[0].year.water_year + 1 == pair[1].year.water_year);
    let enough_share = place.valley.enough_share;
    let as_it_was = reading.of(rest.iter().map(|year| &year.signs), enough_share, unbroken);

    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let question = Question::new(source, base, axes, reading, &shown).map_err(|fault| say(fault, words))?;
    let whole = 0..question.cells();
    let cells = request.part.map_or(Some(whole), |(part, parts)| question.part(part, parts));
    let cells = cells.ok_or_else(|| say(WhatIfFault::NoSuchCells, words))?;
    let part = request.part.map(|(part, of)| Part { part, of, first_cell: cells.start });
    let (all, done) = (cells.len(), AtomicUsize::new(0));
    let tell = |_, _| {
        let done = done.fetch_add(1, Ordering::Relaxed) + 1;
        if spinner.is_seen() {
            spinner.say(words.say("progress-map", &[("done", done.into()), ("all", all.into())]));
        }
    };
    let values = question.run(cells, &AtomicBool::new(false), tell).map_err(|fault| say(fault, words))?;
    Ok(Sheet {
        place: place.name.get("en").to_owned(),
        sign: reading.key().to_owned(),
        canal: request.canal.clone(),
        years: YearsShown {
            asked: request.years.1.clone(),
            water_years: rest.iter().map(|year| year.year.water_year).collect(),
        },
        dials: base,
        over: question.axes().map(Side::from),
        enough_share,
        as_it_was,
        part,
        values,
    })
}

/// What the map shows, by the keys of the sign and of the canal.
fn reading(sign: &str, canal: Option<&str>, place: &Place, words: &Words) -> Result<Reading, Failure> {
    let gate = match canal {
        None => None,
        Some(_) if place.gates.is_empty() => return Err(refuse(&words.say("error-canal-none", &[]), words)),
        Some(key) => match place.gates.iter().position(|gate| gate.key == key) {
            Some(gate) => Some(gate),
            None => {
                let keys: Vec<&str> = place.gates.iter().map(|gate| gate.key.as_str()).collect();
                let arguments = [("canal", key.into()), ("canals", keys.join(", ").into())];
                return Err(refuse(&words.say("error-canal-unknown", &arguments), words));
            }
        },
    };
    Reading::from_key(sign, gate).ok_or_else(|| {
        let keys: Vec<&str> = Reading::keys(gate.is_some()).collect();
        let line = match nearest(sign, keys.iter().copied()) {
            Some(near) => words.say("error-sign-unknown-nearest", &[("sign", sign.into()), ("nearest", near.into())]),
            None => words.say("error-sign-unknown", &[("sign", sign.into()), ("signs", keys.join(", ").into())]),
        };
        refuse(&line, words)
    })
}

/// Why there is no map, in words. The reader of places and the options let nothing else through.
fn say(fault: WhatIfFault, words: &Words) -> Failure {
    match fault {
        WhatIfFault::TooMany => refuse(&words.say("error-map-cells", &[("most", MOST_CELLS.into())]), words),
        WhatIfFault::River(fault) => Failure::input(words.say("error-river-fault", &[("value", fault.value.into())])),
        _ => Failure::input(words.say("error-years-none", &[])),
    }
}

/// A mistake in the options of `map`.
fn refuse(line: &str, words: &Words) -> Failure {
    mistake(line, Some("map"), words)
}
