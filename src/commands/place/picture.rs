//! A small picture of a record in letters: the year of each column, and which years it has.

use chrono::{Datelike, Days, Month};

use crate::place::record::ReadRecord;
use crate::words::Words;

/// Blocks from low to high.
const BLOCKS: [char; 8] = ['▁', '▂', '▃', '▄', '▅', '▆', '▇', '█'];
/// Where there is nothing.
const NOTHING: char = '·';
/// Years that a line of the second picture has.
const YEARS_IN_LINE: usize = 60;

/// The mean of each month for every column, each scaled from its own lowest to its own highest month.
pub(super) fn of_months(record: &ReadRecord, width: usize, words: &Words) -> Vec<String> {
    let months: Vec<Month> = (1..=12u8).filter_map(|month| Month::try_from(month).ok()).collect();
    let letters: Vec<String> = months.iter().map(|month| words.month_letter(*month)).collect();
    let mut lines = vec![format!("{:width$}  {}", "", letters.join(" "))];
    for column in &record.columns {
        let mut sums = [(0.0, 0usize); 12];
        for (day, value) in column.values.iter().enumerate().filter(|(_, value)| !value.is_nan()) {
            let date = record.first_date + Days::new(day as u64);
            let sum = &mut sums[date.month0() as usize % 12];
            *sum = (sum.0 + value, sum.1 + 1);
        }
        let means: Vec<Option<f64>> = sums.iter().map(|(sum, n)| (*n > 0).then(|| sum / *n as f64)).collect();
        let blocks: Vec<String> = blocks(&means).into_iter().map(String::from).collect();
        lines.push(format!("{}  {}", padded(&column.name, width), blocks.join(" ")));
    }
    lines
}

/// How much of each calendar year every column has: a full block for all its days.
pub(super) fn of_years(record: &ReadRecord, width: usize, words: &Words) -> Vec<String> {
    let (first, last) = (record.first_date.year(), record.last_date().year());
    let years: Vec<i32> = (first..=last).collect();
    let mut lines = Vec::new();
    for part in years.chunks(YEARS_IN_LINE) {
        let ends = [part.first(), part.last()].map(|year| words.year(year.copied().unwrap_or(first)));
        lines.push(format!("{:width$}  {}–{}", "", ends[0], ends[1]));
        for column in &record.columns {
            let mut counts = vec![0usize; part.len()];
            for (day, value) in column.values.iter().enumerate() {
                let year = (record.first_date + Days::new(day as u64)).year();
                let place = usize::try_from(year - part[0]).ok().and_then(|index| counts.get_mut(index));
                if let (Some(count), false) = (place, value.is_nan()) {
                    *count += 1;
                }
            }
            let block = |count: &usize| match *count {
                0 => NOTHING,
                count => BLOCKS[((count * BLOCKS.len() + 182) / 365).clamp(1, BLOCKS.len()) - 1],
            };
            let strip: String = counts.iter().map(block).collect();
            lines.push(format!("{}  {strip}", padded(&column.name, width)));
        }
    }
    lines
}

/// Blocks for values between the lowest and the highest of them.
fn blocks(values: &[Option<f64>]) -> Vec<char> {
    let there = values.iter().flatten().copied();
    let low = there.clone().fold(f64::INFINITY, f64::min);
    let high = there.fold(f64::NEG_INFINITY, f64::max);
    let block = |value: &Option<f64>| match value {
        None => NOTHING,
        Some(_) if high <= low => BLOCKS[3],
        Some(value) => BLOCKS[(((value - low) / (high - low) * 7.0 + 0.5) as usize).min(7)],
    };
    values.iter().map(block).collect()
}

/// A name in a column of `width` letters.
pub(super) fn padded(name: &str, width: usize) -> String {
    let letters = name.chars().count();
    if letters > width {
        return name.chars().take(width.saturating_sub(1)).chain(['…']).collect();
    }
    format!("{name}{}", " ".repeat(width - letters))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn blocks_reach_from_the_lowest_to_the_highest() {
        let drawn: String = blocks(&[Some(-5.0), None, Some(2.0), Some(9.0)]).into_iter().collect();
        assert_eq!(drawn, "▁·▅█");
        let flat: String = blocks(&[Some(1.0), Some(1.0)]).into_iter().collect();
        assert_eq!(flat, "▄▄");
        assert_eq!(padded("ñandú", 7), "ñandú  ");
        assert_eq!(padded("temperatura", 5), "temp…");
    }
}
