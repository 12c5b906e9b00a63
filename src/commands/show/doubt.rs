//! How far the answer may be off: the sets of the ensemble run beside it, in the background, since they take long.
//!
//! The answer of the set in use comes first; the range follows when every set has been run, and goes as soon as
//! something else is asked.

use std::sync::Arc;
use std::sync::atomic::{AtomicBool, Ordering};
use std::sync::mpsc::{Receiver, TryRecvError, channel};
use std::thread;

use rayon::prelude::*;

use crate::fit::ensemble::{band, range};
use crate::picture::views::scene::Doubt;
use crate::session::Answers;
use crate::session::answer::{Answer, Asked, Source};
use crate::signs::CanalSigns;
use crate::water::calendar::CalendarDay;
use crate::water::dials::Dials;
use crate::water::valley::Valley;
use crate::water::weather::StationDay;

/// Sets that are run: the first of the ensemble, which are the most apart.
const MOST_SETS: usize = 20;

/// What the sets run on.
struct Ground {
    sets: Vec<Valley>,
    calendar: Vec<CalendarDay>,
    record: Vec<StationDay>,
    /// Gates in the order in which pages show them.
    order: Vec<usize>,
}

/// The ranges of one question.
#[derive(Debug)]
struct Ranges {
    flow: [Vec<f64>; 2],
    storage: Option<[Vec<f64>; 2]>,
    half_volume_days: Option<(i32, i32)>,
    lacking_days: Vec<(i32, i32)>,
    last_full_days: Vec<Option<(i32, i32)>>,
}

/// A question that is being run, and what it asks.
struct Pending {
    asked: (Dials, usize),
    stop: Arc<AtomicBool>,
    answer: Receiver<Option<Ranges>>,
}

/// The range beside the answer.
pub(super) struct Doubts {
    ground: Arc<Ground>,
    pending: Option<Pending>,
    known: Option<((Dials, usize), Ranges)>,
}

impl Doubts {
    /// For these sets; `None` where there are too few to say anything.
    pub fn new(sets: &[Valley], calendar: &[CalendarDay], record: &[StationDay]) -> Option<Self> {
        if sets.len() < 2 {
            return None;
        }
        let gates = &sets[0].gates;
        let mut order: Vec<usize> = (0..gates.len()).collect();
        order.sort_by_key(|&gate| gates[gate].right_date);
        let sets = sets.iter().take(MOST_SETS).cloned().collect();
        let ground = Ground { sets, calendar: calendar.to_vec(), record: record.to_vec(), order };
        Some(Self { ground: Arc::new(ground), pending: None, known: None })
    }

    /// Takes what has come; starts on the question where it is new. True where something new can be shown.
    pub fn look(&mut self, dials: Dials, year: usize) -> bool {
        let asked = (dials, year);
        if self.known.as_ref().is_some_and(|(known, _)| *known != asked) {
            self.known = None;
        }
        if self.pending.as_ref().is_some_and(|pending| pending.asked != asked) {
            self.give_up();
        }
        if let Some(pending) = &self.pending {
            match pending.answer.try_recv() {
                Ok(ranges) => {
                    self.known = ranges.map(|ranges| (asked, ranges));
                    self.pending = None;
                    return self.known.is_some();
                }
                Err(TryRecvError::Empty) => return false,
                // Its thread is gone without an answer; nothing is shown rather than asked for ever.
                Err(TryRecvError::Disconnected) => return false,
            }
        }
        if self.known.is_none() {
            self.ask(asked);
        }
        false
    }

    /// Whether an answer is on its way.
    pub fn is_waiting(&self) -> bool {
        self.pending.is_some()
    }

    /// Waits for the answer to the last question, for pictures that nobody draws twice.
    pub fn wait(&mut self) {
        if let Some(pending) = self.pending.take() {
            self.known = pending.answer.recv().ok().flatten().map(|ranges| (pending.asked, ranges));
        }
    }

    /// As a scene borrows it.
    pub fn shown(&self) -> Option<Doubt<'_>> {
        let (_, ranges) = self.known.as_ref()?;
        fn ends([low, high]: &[Vec<f64>; 2]) -> (&[f64], &[f64]) {
            (low, high)
        }
        Some(Doubt {
            natural_flow_m3s: Some(ends(&ranges.flow)),
            storage_hm3: ranges.storage.as_ref().map(ends),
            half_volume_days: ranges.half_volume_days,
            lacking_days: &ranges.lacking_days,
            last_full_days: &ranges.last_full_days,
        })
    }

    fn give_up(&mut self) {
        if let Some(pending) = self.pending.take() {
            pending.stop.store(true, Ordering::Relaxed);
        }
    }

    fn ask(&mut self, asked: (Dials, usize)) {
        let (send, answer) = channel();
        let stop = Arc::new(AtomicBool::new(false));
        let (ground, stopped) = (Arc::clone(&self.ground), Arc::clone(&stop));
        let run = move || {
            // Nobody listens any more where something else was asked meanwhile.
            let _ = send.send(ranges(&ground, asked, &stopped));
        };
        // Where the system gives no thread, the answer stands alone, as for a place without an ensemble.
        self.pending = thread::Builder::new().spawn(run).ok().map(|_| Pending { asked, stop, answer });
    }
}

impl Drop for Doubts {
    fn drop(&mut self) {
        self.give_up();
    }
}

/// Two answers of one set: as it was, and as dialled.
type Pair = (Answer, Answer);

fn ranges(ground: &Ground, (dials, year): (Dials, usize), stop: &AtomicBool) -> Option<Ranges> {
    let one = |valley: &Valley| -> Option<Pair> {
        if stop.load(Ordering::Relaxed) {
            return None;
        }
        let source = Source { valley, calendar: &ground.calendar, record: &ground.record };
        let mut answers = Answers::new(&source).ok()?;
        answers.ask(Asked { dials, beside: None, year });
        answers.finish(&source).ok()?;
        Some((answers.rest().clone(), answers.dialled().clone()))
    };
    let pairs: Option<Vec<Pair>> = ground.sets.par_iter().map(one).collect();
    let pairs = pairs?;
    let series = |value: &dyn Fn(&Answer, usize) -> f64| -> [Vec<f64>; 2] {
        let all: Vec<Vec<f64>> =
            pairs.iter().map(|(_, now)| (0..now.year.days.len()).map(|day| value(now, day)).collect()).collect();
        let (low, high) = band(&all).into_iter().unzip();
        [low, high]
    };
    let has_lake = ground.sets[0].reservoir.is_some();
    let signs = |answer: &Answer| answer.run.years.get(year).map(|report| report.signs.clone());
    let years: Option<Vec<_>> = pairs.iter().map(|(was, now)| Some((signs(was)?, signs(now)?))).collect();
    let years = years?;
    let day = |day: Option<CalendarDay>| day.map(|day| i32::from(day.day_of_water_year));
    let lacking = |canal: &CanalSigns| i32::from(canal.days_short) + i32::from(canal.days_cut);
    Some(Ranges {
        flow: series(&|answer, day| answer.year.days[day].inflow_m3s),
        storage: has_lake.then(|| series(&|answer, day| answer.year.dead_hm3 + answer.year.days[day].content_hm3)),
        half_volume_days: whole(
            years.iter().map(|(was, now)| Some(day(now.half_volume_date)? - day(was.half_volume_date)?)),
        ),
        lacking_days: ground
            .order
            .iter()
            .map(|&gate| {
                let changes = years
                    .iter()
                    .map(|(was, now)| Some(lacking(now.canals.get(gate)?) - lacking(was.canals.get(gate)?)));
                whole(changes).unwrap_or((0, 0))
            })
            .collect(),
        last_full_days: ground
            .order
            .iter()
            .map(|&gate| {
                whole(years.iter().map(|(was, now)| {
                    let last = |canals: Option<&CanalSigns>| day(canals?.last_full_date);
                    Some(last(now.canals.get(gate))? - last(was.canals.get(gate))?)
                }))
            })
            .collect(),
    })
}

/// The range of whole days, as the band has it; `None` where a set has no such day.
fn whole(days: impl Iterator<Item = Option<i32>>) -> Option<(i32, i32)> {
    let days: Option<Vec<f64>> = days.map(|days| days.map(f64::from)).collect();
    let (low, high) = range(days?)?;
    Some((libm::round(low) as i32, libm::round(high) as i32))
}
