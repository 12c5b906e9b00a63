//! A document as SVG: its pages one below the other, letters as text that can be copied.

use std::fmt::Write as _;

use super::face::Face;
use super::model::{Child, Document, Heads, Ink, Letters, Mark, Node, Piece, Role};

/// Grey between two pages, points.
const BETWEEN: f64 = 12.0;

/// The document as one drawing.
pub fn write_svg(document: &Document) -> String {
    let (wide, high) = document.paper.size_pt();
    let count = document.pages.len() as f64;
    let whole = high * count + BETWEEN * (count - 1.0);
    let mut text = format!(
        "<svg xmlns=\"http://www.w3.org/2000/svg\" lang=\"{}\" width=\"{wide}pt\" height=\"{}pt\" viewBox=\"0 0 {wide} {}\" \
         font-family=\"B612, sans-serif\">\n<title>{}</title>\n",
        escaped(&document.language),
        short(whole),
        short(whole),
        escaped(&document.title),
    );
    for (index, page) in document.pages.iter().enumerate() {
        let down = (high + BETWEEN) * index as f64;
        let _ = writeln!(text, "<g transform=\"translate(0 {})\">", short(down));
        let _ = writeln!(text, "<rect width=\"{wide}\" height=\"{high}\" fill=\"#ffffff\"/>");
        page.parts.iter().for_each(|part| write_part(part, &mut text));
        text.push_str("</g>\n");
    }
    text.push_str("</svg>\n");
    text
}

fn write_part(part: &Node, text: &mut String) {
    let role = match &part.role {
        Role::Artifact => Some(" aria-hidden=\"true\"".to_owned()),
        Role::Heading(level) => Some(format!(" role=\"heading\" aria-level=\"{level}\"")),
        Role::Figure(words) => Some(format!(" role=\"img\" aria-label=\"{}\"", escaped(words))),
        Role::Table => Some(" role=\"table\"".to_owned()),
        Role::Row => Some(" role=\"row\"".to_owned()),
        Role::HeadCell(Heads::Row) => Some(" role=\"rowheader\"".to_owned()),
        Role::HeadCell(Heads::Column) => Some(" role=\"columnheader\"".to_owned()),
        Role::Cell => Some(" role=\"cell\"".to_owned()),
        Role::Paragraph | Role::Section => None,
    };
    let language = part.language.as_ref().map(|tag| format!(" lang=\"{}\"", escaped(tag)));
    let grouped = role.is_some() || language.is_some();
    if grouped {
        let _ = write!(text, "<g{}{}>", role.unwrap_or_default(), language.unwrap_or_default());
    }
    for child in &part.children {
        match child {
            Child::Node(node) => write_part(node, text),
            Child::Piece(Piece::Mark(mark)) => write_mark(mark, text),
            Child::Piece(Piece::Letters(letters)) => write_letters(letters, text),
        }
    }
    if grouped {
        text.push_str("</g>\n");
    }
}

fn write_mark(mark: &Mark, text: &mut String) {
    let mut path = String::new();
    for run in &mark.runs {
        for (index, at) in run.iter().filter(|at| at.x.is_finite() && at.y.is_finite()).enumerate() {
            path.push(if index == 0 { 'M' } else { 'L' });
            let _ = write!(path, "{} {}", short(at.x), short(at.y));
        }
        if mark.closed {
            path.push('Z');
        }
    }
    let _ = write!(text, "<path d=\"{path}\" fill=\"{}\"", mark.fill.map_or_else(|| "none".to_owned(), colour));
    if let Some(line) = mark.line {
        let _ = write!(
            text,
            " stroke=\"{}\" stroke-width=\"{}\" stroke-linejoin=\"round\"",
            colour(line.ink),
            short(line.width)
        );
        if let Some((on, off)) = line.dash {
            let _ = write!(text, " stroke-dasharray=\"{} {}\"", short(on), short(off));
        }
    }
    text.push_str("/>\n");
}

fn write_letters(letters: &Letters, text: &mut String) {
    let shown = letters.text.trim_end();
    if shown.is_empty() {
        return;
    }
    let weight = if letters.face == Face::Bold { " font-weight=\"bold\"" } else { "" };
    // Where the face is not at hand, another keeps to the same width.
    let _ = writeln!(
        text,
        "<text x=\"{}\" y=\"{}\" font-size=\"{}\"{weight} fill=\"{}\" textLength=\"{}\" \
         lengthAdjust=\"spacingAndGlyphs\">{}</text>",
        short(letters.at.x),
        short(letters.at.y),
        short(letters.size),
        colour(letters.ink),
        short(letters.face.width(shown, letters.size)),
        escaped(shown),
    );
}

fn colour(ink: Ink) -> String {
    let [red, green, blue] = ink.rgb();
    format!("#{red:02x}{green:02x}{blue:02x}")
}

/// At most two decimals.
fn short(value: f64) -> String {
    let written = format!("{value:.2}");
    let written = written.trim_end_matches('0').trim_end_matches('.');
    if written == "-0" { "0".to_owned() } else { written.to_owned() }
}

fn escaped(text: &str) -> String {
    let mut safe = String::with_capacity(text.len());
    for letter in text.chars() {
        match letter {
            '&' => safe.push_str("&amp;"),
            '<' => safe.push_str("&lt;"),
            '>' => safe.push_str("&gt;"),
            '"' => safe.push_str("&quot;"),
            // XML knows no other control characters.
            letter if letter.is_control() => safe.push(' '),
            letter => safe.push(letter),
        }
    }
    safe
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_cannot_break_the_drawing() {
        assert_eq!(escaped("A<B & \"C\"\u{1}"), "A&lt;B &amp; &quot;C&quot; ");
        assert_eq!((short(-0.001), short(12.5), short(3.0)), ("0".into(), "12.5".into(), "3".into()));
    }
}
