//! `handout`: a page to take home, as PDF, SVG or PNG.

mod lesson;
mod request;
mod result;

use clap::ArgMatches;

use super::failure::Failure;
use super::output::{check_target, deliver};
use super::speech::Speech;
use super::spinner::Spinner;
use super::tell_standard_error;
use super::{places, settings};
use crate::handout::{Document, write_pdf, write_png, write_svg};
use crate::words::Words;
use request::{Form, Request};

/// The languages of a page that speaks two.
const LANGUAGES: [&str; 2] = ["en", "es"];

/// Lays the page out and writes it.
pub(super) fn run(speech: &Speech, matches: &ArgMatches) -> Result<(), Failure> {
    let words = &speech.words;
    let request = Request::read(matches, words)?;
    check_target(Some(&request.out), words)?;
    let reading = words.say("progress-reading", &[("path", request.place.display().to_string().into())]);
    let spinner = Spinner::start(reading);
    let opened = places::open_fitted(&request.place, speech)?;
    drop(spinner);
    let voices = voices(speech, &opened.place.region);
    let spinner = Spinner::start(words.say("progress-running", &[]));
    let document = match &request.lesson {
        Some(name) => lesson::lay_out(&opened.place, name, &request, &voices)?,
        None => result::lay_out(opened, &request, &voices)?,
    };
    let bytes = written(&document, request.form, words)?;
    drop(spinner);
    deliver(&bytes, Some(&request.out), words)?;
    let path = request.out.display().to_string();
    let arguments = [("n", document.page_count().into()), ("path", path.into())];
    tell_standard_error(&[words.say("handout-written", &arguments)]);
    Ok(())
}

/// The language asked for, or both, the one that is spoken here first.
fn voices(speech: &Speech, region: &str) -> Vec<Words> {
    let first = speech.for_place(region);
    let other = LANGUAGES.into_iter().find(|language| *language != first.language()).filter(|_| speech.both);
    let (_, region) = region.split_once('-').unzip();
    let second = other.map(|language| Words::for_place(language, region).0);
    std::iter::once(first).chain(second).collect()
}

fn written(document: &Document, form: Form, words: &Words) -> Result<Vec<u8>, Failure> {
    let fault = |reason: String| Failure::input(words.say("handout-fault", &[("reason", reason.into())]));
    match form {
        Form::Pdf => {
            let mut bytes = Vec::new();
            write_pdf(document, &mut bytes).map_err(|error| fault(format!("{error:?}")))?;
            Ok(bytes)
        }
        Form::Svg => Ok(write_svg(document).into_bytes()),
        Form::Png => write_png(document).map_err(|error| fault(format!("{error:?}"))),
    }
}
