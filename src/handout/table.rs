//! Tables whose cells say the same in one language or in two.

use super::face::Face;
use super::flow::Block;
use super::model::{At, Child, Heads, Ink, Node, Role};
use super::pen::{End, Style, letters, straight};

/// Between two columns.
const GAP: f64 = 12.0;
/// Above and under the text of a row.
const PAD: f64 = 1.7;

/// A cell, said once for each language; what is the same in all of them is written once.
pub(super) type Cell = Vec<String>;

/// How a column is written.
#[derive(Clone, Copy, Debug)]
pub(super) struct Column {
    pub end: End,
    pub style: Style,
}

/// A table: heads, then rows as wide as the heads. The first column names its row and takes what is left of the width.
pub(super) struct Table<'t> {
    pub columns: &'t [Column],
    pub heads: &'t [Cell],
    pub rows: &'t [Vec<Cell>],
    /// The language of each line of a cell.
    pub tags: &'t [&'t str],
}

/// The heads of columns.
const HEAD: Style = Style::new(Face::Bold, 7.4, Ink::Quiet);
/// The narrowest that a number may make its column.
const LEAST: f64 = 40.0;

impl Table<'_> {
    /// Lays the table out.
    pub fn lay_out(&self, width: f64) -> Block {
        let widths = self.widths(width);
        let mut table = Node::new(Role::Table);
        let mut y = 0.0;
        y += self.row(&mut table, self.heads, &widths, y, true);
        table.push(rule(width, y, Ink::Black));
        for (index, row) in self.rows.iter().enumerate() {
            if index > 0 {
                table.push(rule(width, y, Ink::Faint));
            }
            y += self.row(&mut table, row, &widths, y, false);
        }
        // Rules are no rows: they stand beside the table, before it.
        let (rules, rows): (Vec<Child>, Vec<Child>) = table
            .children
            .into_iter()
            .partition(|child| matches!(child, Child::Node(node) if node.role == Role::Artifact));
        let ornament = Node { role: Role::Section, language: None, children: rules };
        let table = Node { role: Role::Table, language: None, children: rows };
        Block { nodes: vec![ornament, table], high: y }
    }

    /// Every column as wide as its widest line, the first what is left.
    fn widths(&self, width: f64) -> Vec<f64> {
        let own = |index: usize| {
            let style = self.columns[index].style;
            let cells = self.rows.iter().filter_map(|row| row.get(index)).flatten();
            let widest = cells.map(|line| style.width(line)).fold(LEAST, f64::max);
            // A head breaks in two rather than make its column wide.
            let heads = self.heads.get(index).into_iter().flatten().map(|line| {
                // Heads of two languages are long, and their values are not.
                HEAD.width(line) * if line.contains(" · ") { 0.38 } else { 0.66 }
            });
            let widest = heads.fold(widest, f64::max);
            let words = self.heads.get(index).into_iter().flatten().flat_map(|line| line.split(' '));
            words.map(|word| HEAD.width(word)).fold(widest, f64::max)
        };
        let mut widths: Vec<f64> = (0..self.columns.len()).map(own).collect();
        let rest: f64 = widths.iter().skip(1).map(|own| own + GAP).sum();
        if let Some(first) = widths.first_mut() {
            *first = (width - rest).max(LEAST);
        }
        // Should all that be wider than the page, every column gives way.
        let whole: f64 = widths.iter().sum::<f64>() + GAP * widths.len().saturating_sub(1) as f64;
        if whole > width + 0.1 {
            let share = (width - GAP * widths.len().saturating_sub(1) as f64) / widths.iter().sum::<f64>();
            widths.iter_mut().for_each(|own| *own *= share);
        }
        widths
    }

    /// Adds a row and gives its height.
    fn row(&self, table: &mut Node, cells: &[Cell], widths: &[f64], top: f64, is_head: bool) -> f64 {
        let mut row = Node::new(Role::Row);
        let mut high: f64 = 0.0;
        let styled = |index: usize| if is_head { HEAD } else { self.columns[index].style };
        let lines: Vec<Vec<(String, usize)>> = cells
            .iter()
            .enumerate()
            .take(widths.len())
            .map(|(index, cell)| broken(cell, styled(index), widths[index]))
            .collect();
        let most = lines.iter().map(Vec::len).max().unwrap_or(0);
        let mut x = 0.0;
        for (index, lines) in lines.iter().enumerate() {
            let (style, end) = (styled(index), self.columns[index].end);
            let role = match (is_head, index) {
                (true, _) => Role::HeadCell(Heads::Column),
                (false, 0) => Role::HeadCell(Heads::Row),
                (false, _) => Role::Cell,
            };
            let mut node = Node::new(role);
            let anchor = match end {
                End::Left => x,
                End::Middle => x + widths[index] / 2.0,
                End::Right => x + widths[index],
            };
            // Heads stand on the rule under them.
            let down = if is_head { (most - lines.len()) as f64 * style.line_pt() } else { 0.0 };
            let mut spoken: Vec<(usize, Vec<super::model::Piece>)> = Vec::new();
            for (at, (text, voice)) in lines.iter().enumerate() {
                let y = top + PAD + down + style.rise_pt() + style.line_pt() * at as f64;
                let shown = if at + 1 < lines.len() { format!("{text} ") } else { text.clone() };
                let piece = letters(&shown, At::new(anchor, y), end, style.fitting(text, widths[index], 4.0));
                match spoken.last_mut() {
                    Some((last, pieces)) if last == voice => pieces.push(piece),
                    _ => spoken.push((*voice, vec![piece])),
                }
            }
            for (voice, pieces) in spoken {
                match self.tags.get(voice).filter(|_| voice > 0) {
                    None => node.children.extend(pieces.into_iter().map(Child::Piece)),
                    Some(tag) => node.push(Node::of(Role::Paragraph, pieces).in_language(Some((*tag).to_owned()))),
                }
            }
            high = high.max(style.line_pt() * lines.len() as f64 + 2.0 * PAD);
            row.push(node);
            x += widths[index] + GAP;
        }
        table.push(row);
        high
    }
}

/// The lines of a cell with the language of each.
fn broken(cell: &[String], style: Style, width: f64) -> Vec<(String, usize)> {
    let mut lines = Vec::new();
    for (voice, text) in cell.iter().enumerate() {
        if text.is_empty() || cell[..voice].iter().any(|other| says_the_same(other, text)) {
            continue;
        }
        lines.extend(style.face.lines(text, style.size, width).into_iter().map(|line| (line, voice)));
    }
    lines
}

/// Whether two languages say the same: "67%" and "67 %", "48,600" and "48 600".
pub(super) fn says_the_same(one: &str, other: &str) -> bool {
    fn told(text: &str) -> impl Iterator<Item = char> + '_ {
        text.chars().filter(|letter| letter.is_alphanumeric())
    }
    one == other || (!one.chars().any(char::is_alphabetic) && told(one).eq(told(other)))
}

fn rule(width: f64, y: f64, ink: Ink) -> Node {
    Node::of(Role::Artifact, vec![straight(At::new(0.0, y), At::new(width, y), 0.5, ink)])
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::handout::pen::BODY;

    #[test]
    fn cells_are_said_once_where_both_languages_say_the_same() {
        let same = broken(&["12".to_owned(), "12".to_owned()], BODY, 100.0);
        assert_eq!(same, [("12".to_owned(), 0)]);
        let grouped = broken(&["48,600".to_owned(), "48\u{202f}600".to_owned()], BODY, 100.0);
        assert_eq!(grouped.len(), 1);
        let other = broken(&["May 9".to_owned(), "9 may".to_owned()], BODY, 100.0);
        assert_eq!(other, [("May 9".to_owned(), 0), ("9 may".to_owned(), 1)]);
    }

    #[test]
    fn columns_fill_the_width() {
        let columns = [Column { end: End::Left, style: BODY }, Column { end: End::Right, style: BODY }];
        let cell = |text: &str| vec![text.to_owned()];
        let table = Table {
            columns: &columns,
            heads: &[cell("Sign"), cell("As it was")],
            rows: &[vec![cell("Snow"), cell("123 mm")]],
            tags: &["en-US"],
        };
        let widths = table.widths(300.0);
        assert!((widths.iter().sum::<f64>() + GAP - 300.0).abs() < 1e-9, "{widths:?}");
        assert!(table.lay_out(300.0).high > 20.0);
    }
}
