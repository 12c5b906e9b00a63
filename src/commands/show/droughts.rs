//! The settings that are part of the program, as the session calls them up.

use std::path::Path;

use crate::place::demo::droughts;
use crate::place::{DialPlan, Setting as PlaceSetting, Years, read_setting};
use crate::session::{NamedSetting, Offer, Setting, Third, YearChoice};
use crate::signs::YearReport;

/// The offer with the droughts that the place can show, and what they are called, in the same order.
pub(super) fn with_droughts(offer: Offer, plan: &DialPlan, years: &[YearReport]) -> (Offer, Vec<PlaceSetting>) {
    let read = |(key, text): &(&str, &str)| {
        // A place whose dials do not go that far cannot show it; the list is then shorter.
        let setting = read_setting(Path::new(key), text, plan).setting?;
        let year = year_of(setting.years, years);
        let named = NamedSetting { key: (*key).to_owned(), setting: Setting { dials: setting.dials, year } };
        named.setting.fits(&offer).ok().map(|()| (named, setting))
    };
    let (named, told): (Vec<NamedSetting>, Vec<PlaceSetting>) = droughts().iter().filter_map(read).unzip();
    (offer.with_settings(named), told)
}

/// The year that is shown for the years that a setting looks at; `None` leaves it as it is.
fn year_of(asked: Years, years: &[YearReport]) -> Option<YearChoice> {
    Some(YearChoice::Of(match asked {
        Years::All => return None,
        Years::Dry => Third::Dry,
        Years::Middling => Third::Middling,
        Years::Wet => Third::Wet,
        Years::Span(first, _) => {
            return years.iter().position(|year| year.year.water_year == first).map(YearChoice::Any);
        }
    }))
}
