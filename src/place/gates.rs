//! Canals and towns: the gates on the river, in the order in which the river meets them.

use super::crops::{Crops, key};
use super::dated::{month_day_or, priority, season, season_days};
use super::fields::{FieldNames, ReadField, loss};
use super::problem::{Location, Problem};
use super::rights_file::RightsFile;
use super::section::{Limits, Number, Section};
use super::slopes::share;
use super::text::{Text, need_names};
use super::unit_suffix::{DAILY_M3, DAYS, FLOW_M3S, PLAIN, SHARE, VOLUME_HM3};
use crate::water::calendar::{MonthDay, Season};
use crate::water::canals::{PriorityDate, SharingRule};
use crate::water::valley::{Gate, MOST_GATES, Purpose, Town};

/// Flows of gates, outlets and minimums, m³/s: up to the greatest rivers.
pub(super) const FLOW: Limits = Limits(0.0, 50_000.0);
/// The same where none at all makes no sense: from a tenth of a litre per second.
const SOME_FLOW: Limits = Limits(0.000_1, FLOW.1);
/// Shortest season of a canal, days.
pub(super) const SHORTEST_SEASON: u16 = 7;

/// What people read of a gate.
#[derive(Clone, Debug, PartialEq)]
pub struct GateNames {
    /// Its short stable name in files and results.
    pub key: String,
    /// Its name.
    pub name: Text,
    /// The year of its right; `None` for one before every date.
    pub right_year: Option<i32>,
    /// Its fields, in the order of the valley's; none for a town.
    pub fields: Vec<FieldNames>,
}

/// A gate as read, with the places that later checks point at.
pub(super) struct ReadGate {
    /// The gate.
    pub gate: Gate,
    /// Its names.
    pub names: GateNames,
    /// Fields, which are put into the gate when the crop to swap to is known.
    pub fields: Vec<ReadField>,
    /// Where the gate stands.
    pub at: Location,
    /// The right's rate.
    pub decreed: Number,
    /// The canal's capacity.
    pub capacity: Number,
    /// Its account in the reservoir.
    pub storage: Number,
    /// The most that it may take in a year.
    pub yearly_limit: Option<Number>,
    /// Its turn.
    pub turn: Number,
    /// Opening and closing as stated.
    pub season: Option<(Season, Location)>,
    /// What the file says about a season over New Year.
    pub over_new_year: Option<bool>,
    position: Option<Number>,
    returns_above: Option<(String, Location)>,
}

/// Reads every `[[canal]]` and `[[town]]`.
pub(super) fn read(root: &Section<'_>, rule: SharingRule, rights: &RightsFile, crops: &Crops) -> Vec<ReadGate> {
    let (canals, towns) = (root.sections("canal"), root.sections("town"));
    let mut gates: Vec<ReadGate> = canals.iter().map(|canal| gate(canal, rule, rights, Some(crops))).collect();
    gates.extend(towns.iter().map(|town| gate(town, rule, rights, None)));
    // The two kinds may be mixed: the file's own order is the river's.
    gates.sort_by_key(|gate| (gate.at.line, gate.at.column));
    let mut known: Vec<String> = Vec::new();
    for gate in &gates {
        if known.contains(&gate.names.key) && !gate.names.key.is_empty() {
            root.sheet.tell(Problem::error(gate.at.clone(), "problem-same-key").with("key", gate.names.key.clone()));
        }
        known.push(gate.names.key.clone());
    }
    rights.tell_strangers(&known, root);
    by_position(root, &mut gates);
    if let Some(beyond) = gates.get(MOST_GATES) {
        let problem = Problem::error(beyond.at.clone(), "problem-too-many-gates");
        root.sheet.tell(problem.with("found", gates.len()).with("most", MOST_GATES));
    }
    resolve_returns(root, &mut gates);
    gates
}

fn gate(section: &Section<'_>, rule: SharingRule, rights: &RightsFile, crops: Option<&Crops>) -> ReadGate {
    let key = key(section);
    let is_town = crops.is_none();
    let by_date = rule == SharingRule::Seniority;
    let listed = rights.of(&key);
    let own_right = priority(section, "right");
    let own_rate = section.number("rate", FLOW_M3S, SOME_FLOW);
    if let Some(listed) = &listed {
        let twice = section.peek("right").is_some() && listed.right.is_some();
        if twice || (own_rate.is_some() && listed.rate.is_some()) {
            let problem = Problem::error(section.at.clone(), "problem-right-twice");
            section.sheet.tell(problem.with("key", key.clone()));
        }
    }
    let right = own_right.map(|(right, _)| right).or(listed.as_ref().and_then(|listed| listed.right));
    if right.is_none() && by_date && section.peek("right").is_none() {
        section.tell_missing("right");
    }
    let right_date = right.unwrap_or(PriorityDate::BeforeAll);
    let has_rate = own_rate.is_some() || listed.as_ref().is_some_and(|listed| listed.rate.is_some());
    let decreed = if by_date && !has_rate {
        section.need_number("rate", FLOW_M3S, SOME_FLOW)
    } else {
        let unlimited = Number { value: f64::INFINITY, at: section.at.clone(), stated: false };
        own_rate.or(listed.and_then(|listed| listed.rate)).unwrap_or(unlimited)
    };
    let capacity = section.need_number("capacity", FLOW_M3S, SOME_FLOW);
    let storage = section.number_or("storage", SHARE, Limits(0.0, 1.0), 0.0);
    let turn = section.number_or("turn", DAYS, Limits(0.0, 366.0), 0.0);
    if turn.value % 1.0 > 0.0 {
        let problem = Problem::error(turn.at.clone(), "problem-not-whole").with("key", "turn_days");
        section.sheet.tell(problem.with("value", turn.value));
    }
    let season = season(section, "opens", "closes");
    if !is_town && season.is_none() && section.peek("opens").is_none() && section.peek("closes").is_none() {
        section.tell_missing("opens");
    }
    let over_new_year = section.peek("season_over_new_year").map(|_| section.flag_or("season_over_new_year", false));
    let season = season.inspect(|(season, at)| check_season(section, *season, at));
    let conveyance_loss_share = match crops {
        Some(_) => loss(section, &capacity),
        None => section.number_or("loss", SHARE, Limits(0.0, 0.95), 0.10).value,
    };
    let yearly_limit = section.number("yearly_limit", VOLUME_HM3, Limits(0.0, 1.0e6));
    let gate = Gate {
        right_date,
        decreed_m3s: decreed.value,
        canal_m3s: capacity.value,
        storage_share: storage.value,
        stored_loss_share: section.number_or("stored_loss", SHARE, Limits(0.0, 0.95), 0.0).value,
        yearly_limit_hm3: yearly_limit.as_ref().map_or(f64::INFINITY, |limit| limit.value),
        conveyance_loss_share,
        return_share: share(section, "return", if is_town { 1.0 } else { 0.5 }),
        return_days: section.number_or("return", DAYS, Limits(0.0, 3650.0), if is_town { 1.0 } else { 30.0 }).value,
        return_above: 0,
        turn_days: turn.value as u16,
        season: season.as_ref().map_or(Season::ALL_YEAR, |(season, _)| *season),
        purpose: if is_town { Purpose::Town(town(section)) } else { Purpose::Fields(heapless::Vec::new()) },
    };
    ReadGate {
        gate,
        names: GateNames {
            key,
            name: need_names(section, "name"),
            right_year: right_date.right_year(),
            fields: Vec::new(),
        },
        fields: crops.map_or_else(Vec::new, |crops| super::fields::read(section, crops)),
        at: section.at.clone(),
        decreed,
        capacity,
        storage,
        yearly_limit,
        turn,
        season,
        over_new_year,
        position: section.number("position", PLAIN, Limits(1.0, 1000.0)),
        returns_above: returns_above(section),
    }
}

fn check_season(section: &Section<'_>, season: Season, at: &Location) {
    if season_days(season) < SHORTEST_SEASON {
        let days = usize::from(season_days(season));
        section.sheet.tell(Problem::error(at.clone(), "problem-season-short").with("days", days));
    }
}

fn town(section: &Section<'_>) -> Town {
    let daily = section.need_number("need", DAILY_M3, Limits(0.0, 5.0e7));
    let summer = section.section("summer");
    let (from, to) = (month_day_or(&summer, "from", JUNE), month_day_or(&summer, "to", END_OF_AUGUST));
    let more = section.number_or("summer_more", DAILY_M3, Limits(0.0, 5.0e7), 0.0);
    // Which months are summer depends on the hemisphere and on people: it must be said where it counts.
    if more.value > 0.0 && !summer.present {
        section.tell_missing("summer");
    }
    Town {
        daily_m3: daily.value,
        summer_more_m3: more.value,
        summer: Season { from, to },
        used_up_share: share(section, "used_up", 0.3),
    }
}

/// First and last day of summer where a town has no summer part; nothing is added on those days.
const JUNE: MonthDay = MonthDay { month: 6, day: 1 };
const END_OF_AUGUST: MonthDay = MonthDay { month: 8, day: 31 };

/// The key of the gate above which lost water comes back, or a word for below all of them.
fn returns_above(section: &Section<'_>) -> Option<(String, Location)> {
    let (name, at) = section.text("returns_above")?;
    Some((name.to_owned(), at))
}

/// Word for a return below every gate.
const BELOW_ALL: &str = "below_all";

/// Orders gates by `position`, where the file gives it; it gives it for all of them or for none.
fn by_position(root: &Section<'_>, gates: &mut [ReadGate]) {
    let with = gates.iter().filter(|gate| gate.position.is_some()).count();
    if with == 0 {
        return;
    }
    if let Some(without) = gates.iter().find(|gate| gate.position.is_none()) {
        root.sheet.tell(Problem::error(without.at.clone(), "problem-position-missing"));
        return;
    }
    gates.sort_by(|a, b| position(a).total_cmp(&position(b)));
    for pair in gates.windows(2) {
        if position(&pair[0]) == position(&pair[1])
            && let Some(number) = &pair[1].position
        {
            let problem = Problem::error(number.at.clone(), "problem-position-twice");
            root.sheet.tell(problem.with("value", number.value));
        }
    }
}

fn position(gate: &ReadGate) -> f64 {
    gate.position.as_ref().map_or(f64::NAN, |number| number.value)
}

/// Turns the names above which water comes back into positions; the next gate downstream where nothing is said.
fn resolve_returns(root: &Section<'_>, gates: &mut [ReadGate]) {
    let keys: Vec<String> = gates.iter().map(|gate| gate.names.key.clone()).collect();
    let below_all = gates.len() + 1;
    for (index, gate) in gates.iter_mut().enumerate() {
        // Positions count from 1, so that the next gate downstream is `index + 2`.
        let next = index + 2;
        let above = match &gate.returns_above {
            None => next,
            Some((name, _)) if name == BELOW_ALL => below_all,
            Some((name, at)) => match keys.iter().position(|key| key == name) {
                Some(found) if found > index => found + 1,
                Some(_) => {
                    let problem = Problem::error(at.clone(), "problem-return-uphill");
                    root.sheet.tell(problem.with("key", gate.names.key.clone()).with("other", name.clone()));
                    next
                }
                None => {
                    let names = keys.iter().cloned().chain([BELOW_ALL.to_owned()]);
                    let problem = Problem::error(at.clone(), "problem-gate-unknown").with("value", name.clone());
                    root.sheet.tell(problem.with_nearest(name, names));
                    next
                }
            },
        };
        gate.gate.return_above = above.min(below_all).min(MOST_GATES + 1) as u8;
    }
}

/// Reads `[sharing]`'s rule.
pub(super) fn rule(sharing: &Section<'_>) -> SharingRule {
    let rules = [
        ("seniority", SharingRule::Seniority),
        ("proportional", SharingRule::Proportional),
        ("rotation", SharingRule::Rotation),
    ];
    if sharing.peek("rule").is_none() {
        sharing.tell_missing("rule");
    }
    sharing.choice("rule", &rules).map_or(SharingRule::Proportional, |(rule, _)| rule)
}
