//! What the generator has to say, in words.

use crate::commands::failure::Failure;
use crate::generator::{FitError, FitNote, GeneratorError, RecipeFault};
use crate::words::{DateStyle, Value, Words};

/// A recipe that makes no sense, with every fault.
pub(super) fn refuse(faults: &[RecipeFault], words: &Words) -> Failure {
    let mut lines = vec![words.say("weather-recipe-refused", &[])];
    lines.extend(faults.iter().map(|fault| format!("  {}", of_fault(fault, words))));
    Failure::Input(lines)
}

/// Why no weather was made.
pub(super) fn of_generator(error: &GeneratorError, words: &Words) -> Failure {
    match error {
        GeneratorError::Recipe(faults) => refuse(faults, words),
        GeneratorError::PastLastDate { .. } => Failure::input(words.say("weather-past-last-date", &[])),
    }
}

fn of_fault(fault: &RecipeFault, words: &Words) -> String {
    // Numbers as the file writes them.
    let plain = |number: f64| Value::from(number.to_string());
    match fault {
        RecipeFault::OutOfRange { key, month, value, least, most } => {
            let numbers = [("value", plain(*value)), ("low", plain(*least)), ("high", plain(*most))];
            let mut arguments = vec![("key", Value::from(*key))];
            arguments.extend(numbers);
            match month {
                None => words.say("weather-fault-range", &arguments),
                Some(month) => {
                    arguments.push(("month", month_name(*month, words).into()));
                    words.say("weather-fault-range-month", &arguments)
                }
            }
        }
        RecipeFault::CurveOutOfRange { key, day, value, least, most } => {
            let arguments = [
                ("key", Value::from(*key)),
                ("day", day.to_string().into()),
                ("value", words.number(*value, 2).into()),
                ("low", plain(*least)),
                ("high", plain(*most)),
            ];
            words.say("weather-fault-curve", &arguments)
        }
        RecipeFault::WetterAfterDry { month } => {
            words.say("weather-fault-wetter-after-dry", &[("month", month_name(*month, words).into())])
        }
        RecipeFault::ImpossibleCorrelations => words.say("weather-fault-correlations", &[]),
    }
}

fn month_name(month: u32, words: &Words) -> String {
    let month = u8::try_from(month).ok().and_then(|month| chrono::Month::try_from(month).ok());
    month.map(|month| words.month_name(month)).unwrap_or_default()
}

/// Why a record could not be learnt from.
pub(super) fn of_fit(error: &FitError, words: &Words) -> Failure {
    let date = |date: &chrono::NaiveDate| ("date", Value::from(words.date(*date, DateStyle::Long)));
    Failure::input(match error {
        FitError::WrongMonth { month } => words.say("weather-fit-month", &[("month", month.to_string().into())]),
        FitError::TooFewYears { full_years, needed } => {
            words.say("weather-record-too-short", &[("n", (*full_years).into()), ("least", (*needed).into())])
        }
        FitError::DatesNotAscending { date: day } => words.say("weather-fit-dates", &[date(day)]),
        FitError::NotANumber { date: day, field } => {
            words.say("weather-fit-missing", &[date(day), ("field", field_name(field, words).into())])
        }
        FitError::NegativePrecipitation { date: day, precipitation_mm } => {
            let amount = words.number(*precipitation_mm, 1);
            words.say("weather-fit-negative", &[date(day), ("amount", amount.into())])
        }
        FitError::TminAboveTmax { date: day, tmin_c, tmax_c } => {
            let [low, high] = [tmin_c, tmax_c].map(|degrees| words.number(*degrees, 1));
            words.say("weather-fit-turned", &[date(day), ("low", low.into()), ("high", high.into())])
        }
        FitError::TooFewDaysOfAKind { wet_days, dry_days, needed } => {
            let arguments = [("wet", (*wet_days).into()), ("dry", (*dry_days).into()), ("least", (*needed).into())];
            words.say("weather-fit-one-kind", &arguments)
        }
        FitError::Unusable(faults) => {
            let mut lines = vec![words.say("weather-fit-unusable", &[])];
            lines.extend(faults.iter().map(|fault| format!("  {}", of_fault(fault, words))));
            return Failure::Input(lines);
        }
    })
}

/// Something to know of a fitted pattern.
pub(super) fn of_note(note: &FitNote, words: &Words) -> String {
    let two = |number: f64| Value::from(words.number(number, 2));
    let month = |month: u32| ("month", Value::from(month_name(month, words)));
    let said = match note {
        FitNote::YearsNotFitted { full_years, needed } => {
            words.say("weather-note-few-years", &[("n", (*full_years).into()), ("least", (*needed).into())])
        }
        FitNote::TotalsSpreadNoMoreThanDays => words.say("weather-note-totals-alike", &[]),
        FitNote::TotalsSpreadTooWide => words.say("weather-note-totals-wide", &[]),
        FitNote::YearMemoryOutside { estimated, taken } => {
            words.say("weather-note-year-memory", &[("estimated", two(*estimated)), ("taken", two(*taken))])
        }
        FitNote::TemperaturesSpreadWide { spread_c } => {
            words.say("weather-note-temperature-wide", &[("spread", words.number(*spread_c, 1).into())])
        }
        FitNote::TemperaturesSpreadNoMoreThanDays => words.say("weather-note-temperature-alike", &[]),
        FitNote::MonthOfOneKind { month: of } => words.say("weather-note-month-one-kind", &[month(*of)]),
        FitNote::WetnessMemoryOutside { month: of, estimated, taken } => {
            let arguments = [month(*of), ("estimated", two(*estimated)), ("taken", two(*taken))];
            words.say("weather-note-wet-memory", &arguments)
        }
        FitNote::DepthsPooled { month: of, wet_days } => {
            words.say("weather-note-depths-pooled", &[month(*of), ("n", (*wet_days).into())])
        }
        FitNote::SameStepAllYear { field } => {
            words.say("weather-note-same-step", &[("field", field_name(field, words).into())])
        }
        FitNote::SimplerSpread { field } => {
            words.say("weather-note-simpler-spread", &[("field", field_name(field, words).into())])
        }
        FitNote::LeftOut { field, days } => {
            words.say("weather-note-left-out", &[("field", field_name(field, words).into()), ("n", (*days).into())])
        }
        FitNote::RadiationAboveClearSky { days } => words.say("weather-note-radiation-high", &[("n", (*days).into())]),
        FitNote::PublishedRadiationMemory => words.say("weather-note-published-radiation", &[]),
        FitNote::PublishedMemory => words.say("weather-note-published-memory", &[]),
        FitNote::DewpointAtMinimum => words.say("weather-note-dewpoint", &[]),
    };
    format!("{}: {said}", words.say("error-warning", &[]))
}

/// What people call a field of a day.
fn field_name(field: &str, words: &Words) -> String {
    let id = match field {
        "tmin_c" => "weather-field-tmin",
        "tmax_c" => "weather-field-tmax",
        "precipitation_mm" => "weather-field-precipitation",
        "solar_mj_m2" => "weather-field-solar",
        "relative_humidity_percent" => "weather-field-humidity",
        _ => "weather-field-wind",
    };
    words.say(id, &[])
}
