//! Columns of text that stay in line on any terminal and when they are copied.

/// Where the text of a column stands.
#[derive(Clone, Copy, PartialEq, Eq)]
pub(in crate::commands) enum Side {
    /// Names.
    Left,
    /// Numbers.
    Right,
}

/// A column of a table.
pub(in crate::commands) struct Column {
    /// Heading; broken over lines where the column is narrow.
    pub heading: String,
    /// Where its text stands.
    pub side: Side,
    /// The most letters of a line; longer text is broken at spaces.
    pub most: usize,
    /// Letters that a heading may take before it is broken, even where the cells are narrower.
    pub heading_most: usize,
}

/// Letters between two columns.
const GAP: usize = 2;

/// The table, a line a row (more where text is broken), without spaces at the end of lines.
pub(in crate::commands) fn lay_out(columns: &[Column], rows: &[Vec<String>]) -> String {
    let widths: Vec<usize> = columns
        .iter()
        .enumerate()
        .map(|(index, column)| {
            let cells = rows.iter().filter_map(|row| row.get(index)).flat_map(|cell| broken(cell, column.most));
            let widest_cell = cells.map(|line| letters(&line)).max().unwrap_or(0);
            let heading = broken(&column.heading, column.heading_most);
            let widest_heading = heading.iter().map(|line| letters(line)).max().unwrap_or(0);
            widest_cell.max(widest_heading)
        })
        .collect();
    let headings: Vec<String> = columns.iter().map(|column| column.heading.clone()).collect();
    let mut text = String::new();
    // Headings stand on the line right above their column.
    line_up(&headings, columns, &widths, true, &mut text);
    for row in rows {
        line_up(row, columns, &widths, false, &mut text);
    }
    text
}

fn line_up(row: &[String], columns: &[Column], widths: &[usize], at_foot: bool, text: &mut String) {
    let cells: Vec<Vec<String>> = row.iter().zip(widths).map(|(cell, width)| broken(cell, *width)).collect();
    let height = cells.iter().map(Vec::len).max().unwrap_or(0);
    for line in 0..height {
        let mut written = String::new();
        for ((cell, column), width) in cells.iter().zip(columns).zip(widths) {
            let skipped = if at_foot { height - cell.len() } else { 0 };
            let part = line.checked_sub(skipped).and_then(|line| cell.get(line)).map_or("", String::as_str);
            let space = " ".repeat(width.saturating_sub(letters(part)));
            if !written.is_empty() || column.side == Side::Right {
                written.push_str(&" ".repeat(GAP));
            }
            match column.side {
                Side::Left => written.extend([part, &space]),
                Side::Right => written.extend([&space, part]),
            }
        }
        text.push_str(written.trim_end());
        text.push('\n');
    }
}

/// The text in lines of at most `most` letters; a longer word stands alone. Lines after the first keep the indent.
pub(super) fn broken(text: &str, most: usize) -> Vec<String> {
    let indent: String = text.chars().take_while(|letter| *letter == ' ').collect();
    let mut lines = vec![indent.clone()];
    for word in text.split(' ').filter(|word| !word.is_empty()) {
        let Some(line) = lines.last_mut() else { break };
        let empty = letters(line) == letters(&indent);
        if empty {
            line.push_str(word);
        } else if letters(line) + 1 + letters(word) <= most {
            line.push(' ');
            line.push_str(word);
        } else {
            lines.push(format!("{indent}{word}"));
        }
    }
    lines
}

/// Places on the screen; every letter of our languages takes one.
fn letters(text: &str) -> usize {
    text.chars().count()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn columns_stay_in_line() {
        let column = |heading: &str, side| Column { heading: heading.into(), side, most: 12, heading_most: 0 };
        let columns = [column("Canal", Side::Left), column("Con sus cambios", Side::Right)];
        let rows = [vec!["Norte".to_owned(), "12\u{a0}345".to_owned()], vec!["Canal de la Vega".into(), "7".into()]];
        let expected =
            "             Con sus\nCanal        cambios\nNorte         12\u{a0}345\nCanal de la        7\nVega\n";
        assert_eq!(lay_out(&columns, &rows), expected);
    }

    #[test]
    fn a_word_longer_than_its_column_is_not_cut() {
        assert_eq!(broken("una palabra larguísima", 5), ["una", "palabra", "larguísima"]);
        assert_eq!(broken("  con sus cambios", 10), ["  con sus", "  cambios"]);
        assert_eq!(broken("", 5), [""]);
    }
}
