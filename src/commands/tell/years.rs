//! Choosing the water years that are shown; the whole record is run whatever is chosen.

use crate::commands::failure::Failure;
use crate::commands::usage::mistake;
use crate::place::Years;
use crate::signs::YearReport;
use crate::words::Words;

/// Reads `--years` of `command`.
pub(in crate::commands) fn read_years(text: &str, command: &str, words: &Words) -> Result<Years, Failure> {
    if let Some(years) = Years::from_key(text) {
        return Ok(years);
    }
    let year = |text: &str| text.parse::<i32>().ok().filter(|_| text.len() == 4);
    let backward = text.split_once("..").and_then(|(first, last)| Some(year(first)? > year(last)?));
    let id = if backward == Some(true) { "error-years-backward" } else { "error-years-unreadable" };
    Err(mistake(&words.say(id, &[("text", text.into())]), Some(command), words))
}

/// Which of the record's years are shown, as indexes in order; `years` is the run at rest, whose natural flow ranks
/// them. Dry and wet are the lowest and highest third, each at least one year; middling is what lies between.
pub(in crate::commands) fn chosen(
    asked: Years,
    years: &[YearReport],
    command: &str,
    words: &Words,
) -> Result<Vec<usize>, Failure> {
    let (Some(first), Some(last)) = (years.first(), years.last()) else {
        return Err(Failure::input(words.say("error-years-none", &[])));
    };
    let mut ranked: Vec<usize> = (0..years.len()).collect();
    // Of two years with the same flow the earlier counts as the drier one, so that the choice never wavers.
    let flow = |index: &usize| years[*index].signs.natural_flow_hm3;
    ranked.sort_by(|a, b| flow(a).total_cmp(&flow(b)).then(a.cmp(b)));
    let third = (years.len() / 3).max(1);
    let mut shown: Vec<usize> = match asked {
        Years::All => ranked,
        Years::Dry => ranked[..third].to_vec(),
        Years::Wet => ranked[years.len() - third..].to_vec(),
        Years::Middling => match ranked.get(third..years.len() - third) {
            Some(middle) if !middle.is_empty() => middle.to_vec(),
            _ => vec![ranked[(years.len() - 1) / 2]],
        },
        Years::Span(from, to) => {
            let known = |year: i32| first.year.water_year <= year && year <= last.year.water_year;
            if let Some(outside) = [from, to].into_iter().find(|year| !known(*year)) {
                let arguments = [
                    ("first", words.year(first.year.water_year).into()),
                    ("last", words.year(last.year.water_year).into()),
                    ("asked", words.year(outside).into()),
                ];
                return Err(mistake(&words.say("error-years-outside", &arguments), Some(command), words));
            }
            (0..years.len()).filter(|index| (from..=to).contains(&years[*index].year.water_year)).collect()
        }
    };
    shown.sort_unstable();
    Ok(shown)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::signs::YearSigns;
    use crate::water::ledger::Ledger;
    use crate::water::run::WaterYear;

    fn report(water_year: i32, natural_flow_hm3: f64) -> YearReport {
        YearReport {
            year: WaterYear { water_year, first: 0, days: 365 },
            signs: YearSigns { water_year, natural_flow_hm3, ..YearSigns::default() },
            ledger: Ledger::default(),
        }
    }

    fn pick(asked: Years, flows: &[f64]) -> Vec<usize> {
        let years: Vec<_> = flows.iter().zip(2001..).map(|(flow, year)| report(year, *flow)).collect();
        chosen(asked, &years, "tell", &Words::new("en").0).unwrap()
    }

    #[test]
    fn years_are_chosen_by_their_natural_flow() {
        let flows = [5.0, 1.0, 4.0, 2.0, 3.0, 9.0, 7.0];
        assert_eq!(pick(Years::Dry, &flows), [1, 3]);
        assert_eq!(pick(Years::Middling, &flows), [0, 2, 4]);
        assert_eq!(pick(Years::Wet, &flows), [5, 6]);
        assert_eq!(pick(Years::Span(2002, 2003), &flows), [1, 2]);
        assert_eq!(pick(Years::All, &flows).len(), 7);
    }

    #[test]
    fn every_kind_has_a_year_however_few_there_are() {
        for flows in [&[3.0][..], &[3.0, 1.0], &[3.0, 1.0, 2.0], &[1.0, 1.0, 1.0, 1.0]] {
            for asked in [Years::Dry, Years::Middling, Years::Wet] {
                assert!(!pick(asked, flows).is_empty(), "{asked:?} of {flows:?}");
            }
        }
    }
}
