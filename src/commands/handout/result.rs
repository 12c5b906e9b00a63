//! The page of a result: runs the place, picks the year, and puts the scene of each language together.

use super::request::Request;
use super::settings;
use crate::commands::failure::Failure;
use crate::commands::places::Opened;
use crate::commands::show::skill::OwnSkill;
use crate::commands::tell::dials::{say_value, turn};
use crate::commands::tell::{Told, sign_rows, usual_system};
use crate::handout::{Document, Paper, QrFault, ResultPage, ResultVoice, SignTable};
use crate::picture::views::facts::PlaceFacts;
use crate::picture::views::scene::{DialSetting, Scene, YearKind};
use crate::place::{UnitSystem, Years};
use crate::session::answer::{AnswerFault, Asked, Source};
use crate::session::scene::{Moment, PlaceTold, Stage, facts_of};
use crate::session::{Answers, Third, YearChoice, YearList};
use crate::water::dials::{Dial, Dials};
use crate::words::{System, Words};

/// The year that the charts show, and how it was chosen.
struct Year {
    index: usize,
    kind: YearKind,
}

/// Runs the place and lays the page out.
pub(super) fn lay_out(opened: Opened, request: &Request, voices: &[Words]) -> Result<Document, Failure> {
    let Some(words) = voices.first() else { return Err(Failure::Input(Vec::new())) };
    let Opened { place, fit } = opened;
    let skill = OwnSkill::of(&place, fit.as_ref());
    let no_run = || Failure::input(words.say("show-no-answer", &[]));
    let setting = match &request.setting {
        Some(name) => Some(settings::open(name, &place.dials, words)?),
        None => None,
    };
    let start = setting.as_ref().map_or(Dials::REST, |setting| setting.dials);
    let dials = turn(start, &request.set, &place.dials, "handout", words)?;
    let asked = request.years.or(setting.as_ref().map(|setting| setting.years));
    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let mut answers = Answers::new(&source).map_err(|fault| refused(fault, words))?;
    let years = YearList::of(&answers.rest().run.years).ok_or_else(no_run)?;
    let year = year_of(asked, &answers, &years).ok_or_else(no_run)?;
    let water_year = answers.rest().run.years.get(year.index).map_or(0, |report| report.signs.water_year);
    answers.ask(Asked { dials, beside: None, year: year.index });
    answers.finish(&source).map_err(|fault| refused(fault, words))?;
    // The table is about the year of the charts unless others were asked for.
    let told_years = asked.unwrap_or(Years::Span(water_year, water_year));
    let told = Told::run(Opened { place, fit }, setting, dials, Some(told_years), false, words)?;
    let system = request.units.unwrap_or_else(|| usual_system(&told.place));
    let paper = request.paper.unwrap_or(match told.place.units {
        UnitSystem::Metric => Paper::A4,
        UnitSystem::Us => Paper::Letter,
    });
    let place = &told.place;
    let source = Source { valley: &place.valley, calendar: &place.calendar, record: &place.days };
    let settings: Vec<DialSetting> =
        place.dials.open().map(|(dial, range)| DialSetting { dial, value: dials.get(dial), range }).collect();
    let names: Vec<Vec<&str>> =
        voices.iter().map(|words| place.gates.iter().map(|gate| gate.name.get(words.tag())).collect()).collect();
    let stages: Vec<Stage<'_>> = voices
        .iter()
        .zip(&names)
        .map(|(words, names)| {
            let told = PlaceTold {
                name: place.name.get(words.tag()),
                invented: place.invented,
                fitted: told.fit.is_some(),
                gate_names: names,
            };
            Stage::new(told, &source, &answers)
        })
        .collect();
    let props: Vec<_> = stages.iter().map(Stage::props).collect();
    let page_voices = voices.iter().zip(stages.iter().zip(&props)).map(|(words, (stage, props))| {
        let moment = Moment {
            dials: &settings,
            chosen: None,
            kind: year.kind,
            day: 0,
            playing: false,
            stale: false,
            units: system,
            second: None,
            doubt: None,
        };
        let facts = facts_of(place, told.percent_per_degree, words.tag());
        let facts = PlaceFacts { old_fit: told.fit.as_ref().is_some_and(|fit| fit.stale), ..facts };
        let skill = skill.as_ref().map(OwnSkill::shown);
        let scene = Scene { facts, skill, ..stage.scene(props, moment) };
        let (heads, rows) = sign_rows(&told, system, words);
        ResultVoice { words, scene, dials: turned(&dials, system, words), table: SignTable { heads, rows } }
    });
    let page = ResultPage { paper, voices: page_voices.collect() };
    match page.lay_out() {
        Ok(Some(document)) => Ok(document),
        Ok(None) => Err(no_run()),
        Err(QrFault::TooLong(bytes)) => Err(Failure::input(words.say("handout-code-too-long", &[("n", bytes.into())]))),
    }
}

/// The year that stands for what was asked: itself, or the middle one by flow of a third or of a span.
fn year_of(asked: Option<Years>, answers: &Answers, years: &YearList) -> Option<Year> {
    let third = |third: Third, kind: YearKind| Some(Year { index: years.index(YearChoice::Of(third))?, kind });
    match asked {
        None | Some(Years::All | Years::Middling) => third(Third::Middling, YearKind::Middling),
        Some(Years::Dry) => third(Third::Dry, YearKind::Dry),
        Some(Years::Wet) => third(Third::Wet, YearKind::Wet),
        Some(Years::Span(first, last)) => {
            let reports = &answers.rest().run.years;
            let mut within: Vec<usize> =
                (0..reports.len()).filter(|index| (first..=last).contains(&reports[*index].signs.water_year)).collect();
            within.sort_by(|a, b| {
                reports[*a].signs.natural_flow_hm3.total_cmp(&reports[*b].signs.natural_flow_hm3).then(a.cmp(b))
            });
            // A span outside the record is refused with its own words when the years are told; any year serves till then.
            let index = within.get(within.len().saturating_sub(1) / 2).copied().unwrap_or(0);
            let kind = match years.third(index)? {
                Third::Dry => YearKind::Dry,
                Third::Middling => YearKind::Middling,
                Third::Wet => YearKind::Wet,
            };
            Some(Year { index, kind })
        }
    }
}

/// Name and value of every dial that is off its rest.
fn turned(dials: &Dials, system: System, words: &Words) -> Vec<(String, String)> {
    let told = |dial: Dial| {
        let value = dials.get(dial)?;
        let name = words.say(&Words::key_id("dial", dial.key()), &[]);
        Some((name, say_value(dial, value, system, words)))
    };
    Dial::ALL.into_iter().filter(|dial| !dials.rests(*dial)).filter_map(told).collect()
}

fn refused(fault: AnswerFault, words: &Words) -> Failure {
    Failure::input(match fault {
        AnswerFault::River(fault) => words.say("error-river-fault", &[("value", fault.value.into())]),
        AnswerFault::Lengths | AnswerFault::NoWholeYear => words.say("show-no-answer", &[]),
    })
}
