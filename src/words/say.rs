//! Saying a message: the chosen language first, English where that fails, and never a raw key on a screen.

use std::borrow::Cow;
use std::sync::{Mutex, OnceLock, PoisonError};

use fluent::concurrent::FluentBundle;
use fluent::types::{FluentNumber, FluentNumberOptions};
use fluent::{FluentArgs, FluentResource, FluentValue};
use unic_langid::LanguageIdentifier;

use super::language::{Choice, Fallback};
use super::locales::Locales;
use super::numbers::{NumberStyle, round_to, trimmed};

/// A kiosk runs for months; more errors than this tell nothing new.
const MOST_ERRORS_KEPT: usize = 64;

/// One argument of a message.
#[derive(Clone, Debug, PartialEq)]
pub enum Value<'a> {
    /// Text as it is: a name, or a quantity that was written already.
    Text(Cow<'a, str>),
    /// An amount with at most that many decimals; written in the style of the region, and selects the plural. A year is
    /// a name and goes in as the text of [`Words::year`].
    Number(f64, u8),
    /// A number that was written already, and still selects the plural.
    Counted {
        /// The number that selects the plural.
        number: f64,
        /// What is written.
        text: Cow<'a, str>,
    },
}

impl<'a> From<&'a str> for Value<'a> {
    fn from(text: &'a str) -> Self {
        Value::Text(Cow::Borrowed(text))
    }
}

impl From<String> for Value<'_> {
    fn from(text: String) -> Self {
        Value::Text(Cow::Owned(text))
    }
}

impl From<i32> for Value<'_> {
    fn from(count: i32) -> Self {
        Value::Number(f64::from(count), 0)
    }
}

impl From<u32> for Value<'_> {
    fn from(count: u32) -> Self {
        Value::Number(f64::from(count), 0)
    }
}

impl From<usize> for Value<'_> {
    fn from(count: usize) -> Self {
        Value::Number(count as f64, 0)
    }
}

/// A message that could not be said; a bug in the program or in a locale, never the fault of the person.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct SayError {
    /// The message, with its attribute after a dot.
    pub id: String,
    /// The language in which it failed.
    pub tag: String,
    /// What failed.
    pub reason: String,
}

/// The words of one language and region. Cheap to ask, safe to share between threads.
pub struct Words {
    tag: String,
    region: Option<String>,
    style: NumberStyle,
    bundle: FluentBundle<FluentResource>,
    english: OnceLock<FluentBundle<FluentResource>>,
    errors: Mutex<Vec<SayError>>,
}

impl std::fmt::Debug for Words {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        f.debug_struct("Words").field("tag", &self.tag).field("region", &self.region).finish_non_exhaustive()
    }
}

impl Words {
    /// The words that ship with the program for a tag (`en`, `es`, `es-CL` ...), and what could not be met.
    pub fn new(tag: &str) -> (Words, Option<Fallback>) {
        Words::for_place(tag, None)
    }

    /// The same for a place: a bare `en` or `es` takes the region of the place, such as `CL`.
    pub fn for_place(tag: &str, place_region: Option<&str>) -> (Words, Option<Fallback>) {
        Locales::embedded().words(tag, place_region)
    }

    pub(super) fn build(choice: Choice, locales: &Locales) -> (Words, Option<Fallback>) {
        let bundle = bundle(&choice.tag, &choice.folders, locales);
        let mut words = Words {
            tag: choice.tag,
            region: choice.region,
            style: NumberStyle::default(),
            bundle,
            english: OnceLock::new(),
            errors: Mutex::new(Vec::new()),
        };
        words.style = words.read_style();
        (words, choice.fallback)
    }

    /// The tag whose words are used, such as `es-US`.
    pub fn tag(&self) -> &str {
        &self.tag
    }

    /// The language alone, such as `es`.
    pub fn language(&self) -> &str {
        self.tag.split('-').next().unwrap_or_default()
    }

    /// The region that decides on units: the one asked for, even where its words fell back to another region's.
    pub fn region(&self) -> Option<&str> {
        self.region.as_deref()
    }

    /// How this region writes numbers.
    pub fn style(&self) -> &NumberStyle {
        &self.style
    }

    /// The message about a dial, sign or ledger entry: topic `dial` and key `canal_lining` give `dial-canal-lining`.
    ///
    /// Keys are the stable English names of the files; every one of them has a message with `short` and, by topic,
    /// `plain` or `stands`.
    pub fn key_id(topic: &str, key: &str) -> String {
        format!("{topic}-{}", key.replace('_', "-"))
    }

    /// Whether there is such a message (or `message.attribute`) in this language.
    pub fn has(&self, id: &str) -> bool {
        let (message, attribute) = split(id);
        self.bundle.get_message(message).is_some_and(|message| match attribute {
            None => message.value().is_some(),
            Some(attribute) => message.get_attribute(attribute).is_some(),
        })
    }

    /// The message `id` (or `id.attribute`) with its arguments filled in.
    ///
    /// Where this language lacks it, or an argument is missing, the English message is said; where that fails too, the
    /// answer is empty. Both are noted for [`Words::take_errors`].
    pub fn say(&self, id: &str, args: &[(&str, Value<'_>)]) -> String {
        let args = self.arguments(args);
        match format(&self.bundle, id, &args) {
            Ok(text) => return text,
            Err(reason) => self.note(id, &self.tag, reason),
        }
        let english = self.english.get_or_init(|| bundle("en-US", &["en".to_owned()], &Locales::embedded()));
        match format(english, id, &args) {
            Ok(text) => text,
            Err(reason) => {
                self.note(id, "en-US", reason);
                String::new()
            }
        }
    }

    /// What could not be said since the last call; at most the first few dozen.
    pub fn take_errors(&self) -> Vec<SayError> {
        std::mem::take(&mut *self.errors.lock().unwrap_or_else(PoisonError::into_inner))
    }

    fn note(&self, id: &str, tag: &str, reason: String) {
        let mut errors = self.errors.lock().unwrap_or_else(PoisonError::into_inner);
        if errors.len() < MOST_ERRORS_KEPT {
            errors.push(SayError { id: id.to_owned(), tag: tag.to_owned(), reason });
        }
    }

    fn arguments<'a>(&self, args: &[(&'a str, Value<'a>)]) -> FluentArgs<'a> {
        let mut written = FluentArgs::with_capacity(args.len());
        for (name, value) in args {
            written.set(*name, self.argument(value));
        }
        written
    }

    fn argument<'a>(&self, value: &Value<'a>) -> FluentValue<'a> {
        match value {
            Value::Text(text) => FluentValue::String(text.clone()),
            Value::Number(number, decimals) => {
                plural_number(round_to(*number, i32::from(*decimals)), self.style.plain(*number, *decimals))
            }
            Value::Counted { number, text } => plural_number(*number, text.clone().into_owned()),
        }
    }

    fn read_style(&self) -> NumberStyle {
        NumberStyle {
            decimal_mark: self.say("number-decimal-mark", &[]),
            thousands_mark: self.say("number-thousands-mark", &[]),
            thousands_from: self.say("number-thousands-from", &[]).parse().unwrap_or(5),
            missing: self.say("number-missing", &[]),
        }
    }
}

/// A number for Fluent. Its text travels in the one free string of the options (`currency`, which nothing here uses
/// otherwise), because the bundle's formatter is a plain function that cannot know the region.
fn plural_number(number: f64, text: String) -> FluentValue<'static> {
    if !number.is_finite() {
        return FluentValue::String(Cow::Owned(text));
    }
    // The plural follows what is written, so digits beyond those that are written must not reach it.
    let selects = trimmed(number, 2).parse().unwrap_or(number);
    let options = FluentNumberOptions { currency: Some(text), ..FluentNumberOptions::default() };
    FluentValue::Number(FluentNumber::new(selects, options))
}

fn write_number<M>(value: &FluentValue<'_>, _: &M) -> Option<String> {
    match value {
        FluentValue::Number(number) => number.options.currency.clone(),
        _ => None,
    }
}

fn bundle(tag: &str, folders: &[String], locales: &Locales) -> FluentBundle<FluentResource> {
    let language: LanguageIdentifier = tag.parse().unwrap_or_default();
    let mut bundle = FluentBundle::new_concurrent(vec![language]);
    // The marks that isolate right-to-left text show up as boxes on small screens.
    bundle.set_use_isolating(false);
    bundle.set_formatter(Some(write_number));
    for folder in folders {
        for text in locales.texts(folder) {
            // What does not parse was reported when the folder was read; the rest of the file is used.
            let resource = FluentResource::try_new(text.to_owned()).unwrap_or_else(|(resource, _)| resource);
            bundle.add_resource_overriding(resource);
        }
    }
    bundle
}

fn split(id: &str) -> (&str, Option<&str>) {
    match id.split_once('.') {
        Some((message, attribute)) => (message, Some(attribute)),
        None => (id, None),
    }
}

fn format(bundle: &FluentBundle<FluentResource>, id: &str, args: &FluentArgs<'_>) -> Result<String, String> {
    let (message, attribute) = split(id);
    let found = bundle.get_message(message).ok_or("no such message")?;
    let pattern = match attribute {
        None => found.value().ok_or("no text")?,
        Some(name) => found.get_attribute(name).ok_or("no such attribute")?.value(),
    };
    let mut errors = Vec::new();
    let text = bundle.format_pattern(pattern, Some(args), &mut errors).into_owned();
    match errors.first() {
        None => Ok(text),
        Some(error) => Err(error.to_string()),
    }
}
