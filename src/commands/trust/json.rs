//! Everything that `trust` knows, as JSON: stable keys, SI units, whatever the language.

use super::table::rating_id;
use crate::commands::fitted::PlaceFit;
use crate::commands::judged::Judged;
use crate::commands::tell::node::Node;
use crate::fit::trust::{Daily, FlowTrust, Ruling, StoreTrust};
use crate::fit::{Half, SplitTest};
use crate::place::Place;
use crate::signs::skill::Rating;

/// The whole answer.
pub(super) fn write(judged: &Judged, place: &Place, fit: Option<&PlaceFit>) -> String {
    let fitted = fit.map(|fit| {
        Node::table([
            ("water_years", Node::List(fit.file.water_years.iter().map(|year| (*year).into()).collect())),
            ("stale", fit.stale.into()),
            ("sets", fit.sets.len().into()),
            ("seed", (fit.file.seed as usize).into()),
        ])
    });
    let link = judged.snow_link.as_ref().map(|link| {
        Node::table([
            ("years", link.years.into()),
            ("correlation_of_errors", link.correlation.into()),
            ("snow_error_share", link.snow_error_share.into()),
            ("volume_error_share", link.volume_error_share.into()),
        ])
    });
    let canal = |(gate, canal): &(usize, StoreTrust)| {
        let name = place.gates.get(*gate).map_or("", |gate| gate.name.get("en"));
        Node::table([("name", name.into()), ("scores", store(canal))])
    };
    let node = Node::table([
        ("place", place.name.get("en").into()),
        ("invented", place.invented.into()),
        ("gauge", place.gauge.is_some().into()),
        ("fit", fitted.into()),
        ("uses", Node::List(judged.rulings.iter().map(ruling).collect())),
        ("tests", Node::List(judged.tests.iter().map(test).collect())),
        ("flow", judged.flow.as_ref().map(flow).into()),
        ("flow_in_unseen_years", judged.unseen.as_ref().map(flow).into()),
        ("snow", judged.snow.as_ref().map(store).into()),
        ("snow_and_volume", link.into()),
        ("storage", judged.storage.as_ref().map(|(lake, _)| store(lake)).into()),
        ("canals", Node::List(judged.canals.iter().map(canal).collect())),
    ]);
    // Numbers and strings in memory always have a JSON form.
    serde_json::to_string_pretty(&node).unwrap_or_default() + "\n"
}

fn ruling(ruling: &Ruling) -> Node {
    let (good, fair) = ruling.score.thresholds();
    Node::table([
        ("use", ruling.of.key().into()),
        ("verdict", ruling.known().key().into()),
        ("score", ruling.score.key().into()),
        ("value", ruling.value.ok().into()),
        ("lacks", ruling.value.err().map(|need| need.key()).into()),
        ("yes_up_to", good.into()),
        ("in_part_up_to", fair.into()),
        ("beaten", ruling.beaten.into()),
    ])
}

fn test(test: &SplitTest) -> Node {
    let half = |half: &Half| {
        Node::table([
            ("water_years", Node::List(half.water_years.iter().map(|year| (*year).into()).collect())),
            ("mean_temperature_c", half.mean_temperature_c.into()),
            ("kling_gupta_fitted_here", half.fitted.kling_gupta.into()),
            ("kling_gupta_never_seen", half.judged.kling_gupta.into()),
            ("nash_sutcliffe_never_seen", half.judged.nash_sutcliffe.into()),
            ("kling_gupta_day_of_year_mean", half.guess_kling_gupta.into()),
            ("verdict", format!("{:?}", half.transfer()).to_lowercase().into()),
        ])
    };
    let parting = match test.parting {
        crate::fit::Parting::EarlierLater => "earlier_later",
        crate::fit::Parting::ColderWarmer => "colder_warmer",
    };
    Node::table([("parting", parting.into()), ("halves", Node::List(test.halves.iter().map(half).collect()))])
}

fn scores(daily: &Daily) -> Node {
    let parts = daily.kling_gupta;
    Node::table([
        ("nash_sutcliffe", daily.nash_sutcliffe.into()),
        ("kling_gupta", parts.map(|parts| parts.efficiency).into()),
        ("correlation", parts.map(|parts| parts.correlation).into()),
        ("variability", parts.map(|parts| parts.variability).into()),
        ("bias", parts.map(|parts| parts.bias).into()),
        ("percent_bias", daily.percent_bias.into()),
    ])
}

fn flow(flow: &FlowTrust) -> Node {
    let rated = |(value, rating): (f64, Rating)| {
        let band = rating_id(rating).trim_start_matches("trust-rating-").replace('-', "_");
        Node::table([("value", value.into()), ("band", band.into())])
    };
    let monthly = flow.monthly.as_ref().map(|monthly| {
        Node::table([
            ("nash_sutcliffe", rated(monthly.nash_sutcliffe)),
            ("rsr", rated(monthly.rsr)),
            ("percent_bias", rated(monthly.percent_bias)),
        ])
    });
    let month = |month: &crate::fit::trust::MonthOfYear| {
        Node::table([
            ("month", i32::from(month.month).into()),
            ("observed_m3s", month.observed_m3s.into()),
            ("modelled_m3s", month.modelled_m3s.into()),
        ])
    };
    let point = |point: &crate::fit::trust::DurationPoint| {
        Node::table([
            ("share", point.share.into()),
            ("observed_m3s", point.observed_m3s.into()),
            ("modelled_m3s", point.modelled_m3s.into()),
        ])
    };
    let year = |year: &crate::fit::trust::YearSkill| {
        Node::table([
            ("water_year", year.water_year.into()),
            ("observed_hm3", year.observed_hm3.into()),
            ("modelled_hm3", year.modelled_hm3.into()),
            ("observed_half_volume_day", i32::from(year.observed_half_day).into()),
            ("modelled_half_volume_day", i32::from(year.modelled_half_day).into()),
            ("nash_sutcliffe", year.nash_sutcliffe.into()),
            ("kling_gupta", year.kling_gupta.into()),
        ])
    };
    let errors = flow.errors.as_ref().map(|shape| {
        Node::table([
            ("from_log_ratio", shape.from.into()),
            ("to_log_ratio", shape.to.into()),
            ("humps_log_ratio", Node::List(shape.humps.iter().map(|hump| hump.at.into()).collect())),
            ("density", Node::List(shape.density.iter().map(|density| (*density).into()).collect())),
        ])
    });
    Node::table([
        ("days", flow.days.into()),
        ("daily", scores(&flow.daily)),
        ("nash_sutcliffe_of_logs", flow.nash_sutcliffe_of_logs.into()),
        ("day_of_year_mean", scores(&flow.guess)),
        ("annual", flow.annual.as_ref().map(scores).into()),
        ("monthly", monthly.into()),
        ("season", Node::List(flow.season.iter().map(month).collect())),
        ("duration", Node::List(flow.duration.iter().map(point).collect())),
        ("high_flow_percent_bias", flow.high_flow_bias.into()),
        ("low_flow_percent_bias", flow.low_flow_bias.into()),
        ("flood_season_percent_bias", flow.flood_season_bias.into()),
        ("late_summer_percent_bias", flow.late_summer_bias.into()),
        ("daily_errors", errors.into()),
        ("years", Node::List(flow.years.iter().map(year).collect())),
    ])
}

fn store(store: &StoreTrust) -> Node {
    Node::table([
        ("days", store.days.into()),
        ("nash_sutcliffe", store.nash_sutcliffe.into()),
        ("kling_gupta", store.kling_gupta.into()),
        ("percent_bias", store.percent_bias.into()),
        ("mean_error", store.mean_error.into()),
        ("mean_observed", store.mean_observed.into()),
        ("nash_sutcliffe_day_of_year_mean", store.guess.into()),
    ])
}
