//! Turning dials from the command line: `--set warming=2`.
//!
//! Steps are for knobs: a value between two steps is taken as it is. The range of the place is strict.

use crate::commands::failure::Failure;
use crate::commands::usage::mistake;
use crate::place::{DialOffer, DialPlan};
use crate::water::dials::{Dial, DialRange, DialUnit, Dials};
use crate::words::{Quantity, System, Words, nearest};

/// What is written where an example is needed.
const EXAMPLE: &str = "warming=2";

/// `start` with every `DIAL=VALUE` of `set` turned; all that is wrong is told at once, as a mistake of `command`.
pub(in crate::commands) fn turn(
    start: Dials,
    set: &[String],
    plan: &DialPlan,
    command: &str,
    words: &Words,
) -> Result<Dials, Failure> {
    let mut dials = start;
    let mut turned: Vec<Dial> = Vec::new();
    let mut wrong = Vec::new();
    for text in set {
        match read(text, plan, words) {
            Ok((dial, _)) if turned.contains(&dial) => {
                wrong.push(words.say("error-dial-twice", &[("dial", dial.key().into())]));
            }
            Ok((dial, value)) => {
                turned.push(dial);
                dials = dials.with(dial, value);
            }
            Err(line) => wrong.push(line),
        }
    }
    if wrong.is_empty() { Ok(dials) } else { Err(mistake(&wrong.join("\n"), Some(command), words)) }
}

fn read(text: &str, plan: &DialPlan, words: &Words) -> Result<(Dial, f64), String> {
    let Some((key, value)) = text.split_once('=') else {
        return Err(words.say("error-dial-no-equals", &[("text", text.into()), ("example", EXAMPLE.into())]));
    };
    let (key, value) = (key.trim(), value.trim());
    let (dial, range) = offered(key, plan, words)?;
    Ok((dial, value_of(dial, range, value, words)?))
}

/// The dial with this key and its range, where the place offers it.
pub(in crate::commands) fn offered(key: &str, plan: &DialPlan, words: &Words) -> Result<(Dial, DialRange), String> {
    let Some(dial) = Dial::from_key(key) else { return Err(unknown(key, plan, words)) };
    let key = || ("dial", dial.key().into());
    match plan.offer(dial) {
        DialOffer::Open(range) => Ok((dial, range)),
        DialOffer::Hidden => Err(words.say("error-dial-hidden", &[key()])),
        DialOffer::Lacking => {
            let reason = words.say(lacking(dial), &[]);
            Err(words.say("error-dial-lacking", &[key(), ("reason", reason.into())]))
        }
    }
}

/// The number that is written, where the dial may stand there.
pub(in crate::commands) fn value_of(dial: Dial, range: DialRange, value: &str, words: &Words) -> Result<f64, String> {
    let key = || ("dial", dial.key().into());
    // People copy what they read, and there a minus is a minus sign.
    let typed = value.replace('\u{2212}', "-");
    let number = typed.parse::<f64>().ok().filter(|number| number.is_finite());
    let Some(number) = number else {
        let with_point = typed.replace(',', ".");
        let meant = with_point.parse::<f64>().ok().filter(|number| number.is_finite()).unwrap_or(range.most);
        let example = format!("{}={meant}", dial.key());
        let arguments = [("value", value.into()), key(), ("example", example.into())];
        return Err(words.say("error-dial-not-a-number", &arguments));
    };
    if number < range.least || number > range.most {
        // The range as it is to be typed, not as people write numbers.
        let [low, high] = [range.least, range.most].map(|end| end.to_string());
        let arguments = [key(), ("low", low.into()), ("high", high.into()), ("value", value.into())];
        return Err(words.say("error-dial-out-of-range", &arguments));
    }
    // −0 would be another number in the output than 0.
    Ok(number + 0.0)
}

fn unknown(key: &str, plan: &DialPlan, words: &Words) -> String {
    let open: Vec<&str> = plan.open().map(|(dial, _)| dial.key()).collect();
    let first = match nearest(key, Dial::ALL.into_iter().map(Dial::key)) {
        Some(near) => words.say("error-dial-unknown-nearest", &[("dial", key.into()), ("nearest", near.into())]),
        None => words.say("error-dial-unknown", &[("dial", key.into())]),
    };
    format!("{first}\n{}", words.say("error-dial-list", &[("dials", open.join(", ").into())]))
}

/// What a place lacks that `dial` would act on.
fn lacking(dial: Dial) -> &'static str {
    match dial {
        Dial::Diversion => "place-lacks-canals",
        Dial::CanalLining => "place-lacks-canal-loss",
        Dial::CropMix => "place-lacks-crop-swap",
        Dial::RiverMinimum => "place-lacks-river-minimum",
        Dial::ReservoirSize | Dial::StartingStorage => "place-lacks-reservoir",
        Dial::TownGrowth => "place-lacks-town",
        // The weather is everywhere; no plan lacks these.
        Dial::Warming | Dial::WinterPrecipitation | Dial::SummerPrecipitation => "place-lacks-nothing",
    }
}

/// Where a dial stands, for people: "+2 °C", "−20%", "40%".
pub(in crate::commands) fn say_value(dial: Dial, value: f64, system: System, words: &Words) -> String {
    match dial.unit() {
        DialUnit::Celsius => {
            let amount = words.quantity(value, Quantity::TemperatureChange, system, 2);
            if value > 0.0 { format!("+{amount}") } else { amount }
        }
        DialUnit::Percent => {
            let amount = words.percent(value, 1);
            let from_zero = matches!(dial, Dial::CanalLining | Dial::CropMix | Dial::StartingStorage);
            if value > 0.0 && !from_zero { format!("+{amount}") } else { amount }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn turned(set: &[&str]) -> Result<Dials, Vec<String>> {
        let (words, _) = Words::new("en");
        let set: Vec<String> = set.iter().map(|text| (*text).to_owned()).collect();
        turn(Dials::REST, &set, &DialPlan::WIDEST, "tell", &words).map_err(|failure| match failure {
            Failure::Usage(lines) | Failure::Input(lines) => lines,
            Failure::ReaderGone => Vec::new(),
        })
    }

    #[test]
    fn dials_are_turned_also_between_steps() {
        let dials = turned(&["warming=1.25", "winter_precipitation=-20"]).unwrap();
        assert_eq!(dials, Dials::REST.with(Dial::Warming, 1.25).with(Dial::WinterPrecipitation, -20.0));
        assert!(turned(&["warming=-0"]).unwrap().warming.is_sign_positive());
        assert_eq!(turned(&["winter_precipitation = \u{2212}20"]).unwrap().winter_precipitation, -20.0);
    }

    #[test]
    fn all_that_is_wrong_is_told_at_once() {
        let comma = turned(&["warming=2,5"]).unwrap_err().join("\n");
        assert!(comma.contains("warming=2.5"), "{comma}");
        let lines = turned(&["warming=9", "warmin=1", "diversion=nan", "diversion", "canal_lining=1e999"]).unwrap_err();
        let told = lines.join("\n");
        for part in [
            "goes from 0 to 6",
            "Did you mean “warming”",
            "“nan” is not a number",
            "“diversion” does not say",
            "“1e999”",
        ] {
            assert!(told.contains(part), "{part}: {told}");
        }
    }
}
