//! The sheets of a lesson: reads it for the place, and on the key holds every guess against the place's water.

use std::path::Path;

use super::request::Request;
use crate::commands::check::{built_in_lesson, is_lesson};
use crate::commands::failure::Failure;
use crate::commands::settings::{SettingText, read_text};
use crate::commands::snippets::{Texts, report};
use crate::commands::tell::dials::say_value;
use crate::commands::tell::{mean_date, usual_system};
use crate::handout::{Document, GuessScale, LessonSheet, Paper, ScaleMark, SheetKind, SheetStep, SheetVoice};
use crate::lesson::{Guess, Lesson, Measure, Over, Quantity, Reading, Shape, Step, Waters, lessons, read_lesson};
use crate::place::{Place, UnitSystem};
use crate::water::canals::RiverFault;
use crate::water::dials::Dial;
use crate::words::{DateStyle, Quantity as Amount, System, Value, Words, nearest};

/// The named values of a guess's line.
const NAMED: usize = 6;

/// Reads the lesson and lays its sheet out.
pub(super) fn lay_out(place: &Place, name: &Path, request: &Request, voices: &[Words]) -> Result<Document, Failure> {
    let Some(words) = voices.first() else { return Err(Failure::Input(Vec::new())) };
    let text = find(name, words)?;
    let river = |fault: RiverFault| Failure::input(words.say("error-river-fault", &[("value", fault.value.into())]));
    let mut waters = Waters::new(place).map_err(river)?;
    let outcome = read_lesson(&text.file, &text.text, &waters);
    let Some(lesson) = outcome.lesson else {
        let shown = [(text.file.to_string_lossy().into_owned(), text.text)];
        return Err(Failure::Input(vec![report(&outcome.problems, &mut Texts::given(&shown), words)]));
    };
    let system = request.units.unwrap_or_else(|| usual_system(place));
    let mut results = Vec::new();
    for step in &lesson.steps {
        let result = match &step.guess {
            Some(guess) => waters.read(&guess.reading, step).map_err(river)?,
            None => None,
        };
        results.push(result);
    }
    let years: Vec<i32> = waters.as_it_was().iter().map(|year| year.signs.water_year).collect();
    let teller = |words| Teller { place, lesson: &lesson, system, words, years: &years };
    let sheet = LessonSheet {
        paper: request.paper.unwrap_or(match place.units {
            UnitSystem::Metric => Paper::A4,
            UnitSystem::Us => Paper::Letter,
        }),
        kind: request.sheet,
        voices: voices.iter().map(|words| teller(words).voice(&results, request.sheet)).collect(),
    };
    sheet.lay_out().ok_or_else(|| Failure::Input(Vec::new()))
}

/// A file of that name goes before what is built in.
fn find(name: &Path, words: &Words) -> Result<SettingText, Failure> {
    if name.is_file() {
        let text = read_text(name, words)?;
        if is_lesson(&text.text) {
            return Ok(text);
        }
        return Err(Failure::input(words.say("handout-no-lesson", &[("path", name.display().to_string().into())])));
    }
    let key = name.to_str().unwrap_or_default();
    if let Some(text) = built_in_lesson(key) {
        return Ok(text);
    }
    let known = || lessons().iter().map(|(name, _)| *name);
    let near = nearest(key, known()).map_or_else(|| known().collect::<Vec<_>>().join(", "), str::to_owned);
    let arguments = [("lesson", name.display().to_string().into()), ("lessons", near.into())];
    Err(Failure::input(words.say("handout-lesson-unknown", &arguments)))
}

struct Teller<'t> {
    place: &'t Place,
    lesson: &'t Lesson,
    system: System,
    words: &'t Words,
    years: &'t [i32],
}

impl<'t> Teller<'t> {
    fn voice(&self, results: &[Option<f64>], kind: SheetKind) -> SheetVoice<'t> {
        let tag = self.words.tag();
        let steps = self.lesson.steps.iter().zip(results).map(|(step, result)| self.step(step, *result, kind));
        SheetVoice {
            words: self.words,
            name: self.lesson.name.get(tag).to_owned(),
            about: self.lesson.text.get(tag).to_owned(),
            place: self.place.name.get(tag).to_owned(),
            steps: steps.collect(),
        }
    }

    fn step(&self, step: &Step, result: Option<f64>, kind: SheetKind) -> SheetStep {
        let tag = self.words.tag();
        let year = self.years.get(step.year).map_or(0, |year| *year);
        let mut shown = vec![self.words.say("picture-year-any", &[("year", self.words.year(year).into())])];
        for dial in Dial::ALL.into_iter().filter(|dial| !step.dials.rests(*dial)) {
            if let Some(value) = step.dials.get(dial) {
                let name = self.words.say(&Words::key_id("dial", dial.key()), &[]);
                let value = say_value(dial, value, self.system, self.words);
                shown.push(self.words.say("tell-dial-line", &[("dial", name.into()), ("value", value.into())]));
            }
        }
        SheetStep {
            prompt: step.prompt.get(tag).to_owned(),
            shown: shown.join(" · "),
            guess: step.guess.as_ref().map(|guess| self.scale(guess, result, kind)),
            reveal: step.reveal.as_ref().map(|text| text.get(tag).to_owned()),
            talk: step.talk.as_ref().map(|text| text.get(tag).to_owned()),
        }
    }

    fn scale(&self, guess: &Guess, result: Option<f64>, kind: SheetKind) -> GuessScale {
        let (least, most) = (guess.least, guess.most());
        let steps = usize::from(guess.stops).saturating_sub(1).max(1);
        let share = |value: f64| (value - least) / (most - least);
        let mark = |value: f64| ScaleMark { share: share(value), text: self.value(&guess.reading, value) };
        // Named values stand on stops of the knob, evenly where that works out.
        let even = (1..steps).find(|every| steps.is_multiple_of(*every) && steps / every < NAMED);
        let every = even.unwrap_or_else(|| steps.div_ceil(NAMED - 2).max(1));
        // A last piece that is short would crowd the name before it.
        let stops =
            (0..=steps).step_by(every).filter(|stop| *stop == 0 || (steps - stop) * 2 >= every || *stop == steps);
        let ends = stops.filter(|stop| *stop < steps).chain([steps]);
        let named = ends.filter_map(|stop| guess.value(u8::try_from(stop).ok()?)).map(mark);
        let is_key = kind == SheetKind::Key;
        GuessScale {
            question: self.question(&guess.reading),
            steps,
            named: named.collect(),
            result: result.filter(|_| is_key).map(mark),
            usual: guess.usual.filter(|_| is_key).map(mark),
        }
    }

    /// What is guessed, in words: "Guess the change: last day of snow".
    fn question(&self, reading: &Reading) -> String {
        let words = self.words;
        let canal = |gate: usize| {
            let name = self.place.gates.get(gate).map_or("", |gate| gate.name.get(words.tag()));
            Value::from(name.to_owned())
        };
        let of_canal = |gate: usize, sign: String| {
            words.say("handout-sign-of-canal", &[("canal", canal(gate)), ("sign", sign.into())])
        };
        let sign = match reading.measure {
            Measure::Sign(sign) => words.say(&Words::key_id("sign", sign.key()), &[]),
            Measure::Canal(gate, sign) => of_canal(gate, words.say(&Words::key_id("sign-canal", sign.key()), &[])),
            Measure::Lesson(sign) => words.say(&Words::key_id("lesson", sign.key()), &[]),
            Measure::CanalYearsEnough(gate) => of_canal(gate, words.say("lesson-years-enough", &[])),
        };
        let id = match (reading.shape, reading.over) {
            (Shape::Value, Over::Year) => "handout-guess-value",
            (Shape::Value, Over::AllYears) => "handout-guess-value-all",
            (Shape::Change, Over::Year) => "handout-guess-change",
            (Shape::Change, Over::AllYears) => "handout-guess-change-all",
        };
        words.say(id, &[("sign", sign.into())])
    }

    /// A value of the reading as people write it; a change with its sign.
    fn value(&self, reading: &Reading, value: f64) -> String {
        let words = self.words;
        let signed = |text: String| {
            if reading.shape == Shape::Change && value > 0.0 { format!("+{text}") } else { text }
        };
        let amount = |quantity: Amount| signed(words.quantity(value, quantity, self.system, 3));
        match reading.quantity() {
            Quantity::Date => {
                let month = self.place.valley.water_year_start_month;
                words.date(mean_date(value, month), DateStyle::Short)
            }
            Quantity::Days if matches!(reading.measure.quantity(), Quantity::Date) => {
                words.days_change(libm::round(value) as i32)
            }
            Quantity::Days => signed(words.say("days-count", &[("n", Value::Number(value, 0))])),
            Quantity::Years => signed(words.say("years-count", &[("n", Value::Number(value, 0))])),
            Quantity::Share if reading.shape == Shape::Change => {
                let id = if value < 0.0 { "tell-points-less" } else { "tell-points-more" };
                match libm::round(value * 100.0) {
                    0.0 => words.say("tell-no-change", &[]),
                    points => words.say(id, &[("n", Value::Number(points.abs(), 0))]),
                }
            }
            Quantity::Share => words.percent(value * 100.0, 0),
            Quantity::Depth => amount(Amount::SnowWater),
            Quantity::Volume => amount(Amount::StoredVolume),
            Quantity::Flow => amount(Amount::Flow),
            Quantity::Canal => self.canal_by_right(value),
        }
    }

    /// The canal at a place in the order of rights, counted from 1.
    fn canal_by_right(&self, place: f64) -> String {
        let gates = &self.place.valley.gates;
        let mut order: Vec<usize> = (0..gates.len()).collect();
        order.sort_by_key(|gate| gates[*gate].right_date);
        let at = libm::round(place) as usize;
        let gate = at.checked_sub(1).and_then(|at| order.get(at)).and_then(|gate| self.place.gates.get(*gate));
        gate.map_or_else(|| self.words.number(place, 0), |gate| gate.name.get(self.words.tag()).to_owned())
    }
}
