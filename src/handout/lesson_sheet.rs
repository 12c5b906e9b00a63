//! The worksheet of a lesson, with room to write and for the guess of every group, and the answer key to it.

use super::chart::each;
use super::face::Face;
use super::flow::{Block, Flow, GUTTER};
use super::model::{At, Document, Ink, Node, Paper, Piece, Role};
use super::paragraph::{column_pt, paragraph, side_by_side};
use super::pen::{BODY, End, NOTE, STRONG, Style, area, centred, corners, edged, letters, line, round, straight};
use crate::words::Words;

/// Which of the two.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum SheetKind {
    /// For the room: empty lines and boxes.
    Work,
    /// For the presenter: what came out, and what to say.
    Key,
}

/// A value on the line of a guess.
#[derive(Clone, Debug, PartialEq)]
pub struct ScaleMark {
    /// Where on the line, 0 at its left end and 1 at its right one; may lie outside.
    pub share: f64,
    /// What stands at it.
    pub text: String,
}

/// The line on which a guess is marked.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct GuessScale {
    /// What is guessed.
    pub question: String,
    /// How many steps the line has.
    pub steps: usize,
    /// The values that are named, from left to right.
    pub named: Vec<ScaleMark>,
    /// What came out; on the key alone.
    pub result: Option<ScaleMark>,
    /// What most people say; on the key alone.
    pub usual: Option<ScaleMark>,
}

/// One step in one language.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct SheetStep {
    /// What the room reads first.
    pub prompt: String,
    /// The year and the dials of the step.
    pub shown: String,
    /// The guess, where one is asked for.
    pub guess: Option<GuessScale>,
    /// What is read with the result.
    pub reveal: Option<String>,
    /// What the presenter may say.
    pub talk: Option<String>,
}

/// The sheet in one language.
#[derive(Debug)]
pub struct SheetVoice<'a> {
    /// The language.
    pub words: &'a Words,
    /// The lesson's name.
    pub name: String,
    /// What it is about.
    pub about: String,
    /// The place on whose water it is held.
    pub place: String,
    /// Its steps; as many in every language.
    pub steps: Vec<SheetStep>,
}

/// A worksheet or an answer key.
#[derive(Debug)]
pub struct LessonSheet<'a> {
    /// The paper.
    pub paper: Paper,
    /// Which of the two.
    pub kind: SheetKind,
    /// One or two languages.
    pub voices: Vec<SheetVoice<'a>>,
}

/// Groups that have a box for their guess.
const GROUPS: usize = 6;
/// Between two steps.
const BREAK: f64 = 15.0;
/// Left of what belongs to a step, for its number.
const INDENT: f64 = 27.0;
const TITLE: Style = Style::new(Face::Bold, 19.0, Ink::Black);
const PROMPT: Style = Style::new(Face::Bold, 10.4, Ink::Black);
/// The letters of children's books are large.
const READ: Style = Style::new(Face::Regular, 9.6, Ink::Black);
/// From one line for writing to the next.
const RULED: f64 = 22.0;

impl LessonSheet<'_> {
    /// Lays the sheet out; `None` without a language.
    pub fn lay_out(&self) -> Option<Document> {
        let first = self.voices.first()?;
        let sheet = Sheet { voices: &self.voices, words: self.voices.iter().map(|voice| voice.words).collect() };
        let mut flow = Flow::new(self.paper).with_foot_lines(self.voices.len());
        let width = flow.width();
        flow.put(sheet.masthead(self.kind, width));
        for index in 0..first.steps.len() {
            flow.gap(BREAK);
            flow.put(sheet.step(index, self.kind, width));
        }
        let always = each(&sheet.words, |words| words.say("handout-always", &[]));
        let number = |n: usize, of: usize| {
            let page = first.words.say("page-sheet", &[("n", n.into()), ("of", of.into())]);
            format!("deshielo · {page}")
        };
        let id = title_id(self.kind);
        let title = first.words.say(&format!("{id}-of"), &[("name", first.name.clone().into())]);
        Some(flow.finish(title, first.words.tag().to_owned(), &always, &number))
    }
}

fn title_id(kind: SheetKind) -> &'static str {
    match kind {
        SheetKind::Work => "handout-worksheet",
        SheetKind::Key => "handout-key",
    }
}

struct Sheet<'s, 'a> {
    voices: &'s [SheetVoice<'a>],
    words: Vec<&'a Words>,
}

impl<'s, 'a> Sheet<'s, 'a> {
    fn told(&self, say: impl Fn(&SheetVoice<'a>) -> String) -> Vec<(String, &'a str)> {
        self.voices.iter().map(|voice| (say(voice), voice.words.tag())).collect()
    }

    fn text(&self, width: f64, style: Style, role: &Role, say: impl Fn(&SheetVoice<'a>) -> String) -> Block {
        let texts = self.told(say);
        if texts.iter().all(|(text, _)| text.is_empty()) {
            return Block::default();
        }
        side_by_side(&texts, width, |text, width| paragraph(text, width, style, role.clone()))
    }

    fn masthead(&self, kind: SheetKind, width: f64) -> Block {
        let head = self.text(width, NOTE, &Role::Paragraph, |voice| {
            format!("{} · {}", voice.words.say(title_id(kind), &[]), voice.place)
        });
        let name = self.text(width, TITLE, &Role::Heading(1), |voice| voice.name.clone());
        let about = self.text(width, READ, &Role::Paragraph, |voice| voice.about.clone());
        let block = head.below(1.0, name).below(2.0, about);
        match kind {
            SheetKind::Work => block.below(14.0, self.names(width)),
            SheetKind::Key => block,
        }
    }

    /// Where the group writes who it is.
    fn names(&self, width: f64) -> Block {
        let say = |id: &str| each(&self.words, |words| words.say(id, &[])).join(" · ");
        let mut nodes = Vec::new();
        let mut lines = Vec::new();
        for (id, from, to) in
            [("handout-field-group", 0.0, 0.28), ("handout-field-names", 0.31, 0.76), ("handout-field-date", 0.79, 1.0)]
        {
            let text = say(id);
            let (left, right) = (width * from, width * to);
            let begin = left + BODY.width(&text) + 5.0;
            nodes.push(Node::of(Role::Paragraph, vec![letters(&text, At::new(left, 9.0), End::Left, BODY)]));
            lines.push(vec![At::new(begin, 11.0), At::new(right, 11.0)]);
        }
        nodes.insert(0, Node::of(Role::Artifact, vec![line(lines, 0.6, Ink::Rule)]));
        Block { nodes, high: 13.0 }
    }

    fn step(&self, index: usize, kind: SheetKind, width: f64) -> Block {
        let inner = width - INDENT;
        let of = |voice: &SheetVoice<'a>| voice.steps.get(index).cloned().unwrap_or_default();
        let mut body = self.text(inner, PROMPT, &Role::Heading(2), |voice| of(voice).prompt);
        body = body.below(1.0, self.text(inner, NOTE, &Role::Paragraph, |voice| of(voice).shown));
        let guesses: Vec<GuessScale> = self.voices.iter().filter_map(|voice| of(voice).guess).collect();
        let has_guess = !guesses.is_empty();
        if has_guess {
            body = body.below(
                5.0,
                self.text(inner, READ, &Role::Paragraph, |voice| {
                    of(voice).guess.map(|guess| guess.question).unwrap_or_default()
                }),
            );
            body = body.below(4.0, self.scale(&guesses, kind, inner));
        }
        match kind {
            SheetKind::Work => {
                if has_guess {
                    body = body.below(7.0, self.boxes(inner));
                    body = body.below(6.0, self.ruled("handout-why", 1, inner));
                    body = body.below(6.0, self.ruled("handout-model-says", 1, inner));
                } else {
                    body = body.below(6.0, self.ruled("handout-we-see", 2, inner));
                }
            }
            SheetKind::Key => {
                body = body.below(
                    5.0,
                    self.text(inner, STRONG, &Role::Paragraph, |voice| of(voice).reveal.unwrap_or_default()),
                );
                body = body
                    .below(3.0, self.text(inner, READ, &Role::Paragraph, |voice| of(voice).talk.unwrap_or_default()));
            }
        }
        body.shift(INDENT, 0.0);
        let radius = 9.0;
        let middle = At::new(radius, radius - 1.5);
        let style = Style::new(Face::Bold, 9.6, Ink::Black);
        let number = (index + 1).to_string();
        let disc = edged(vec![round(middle, radius)], None, 0.9, Ink::Black);
        let text = letters(&number, At::new(middle.x, centred(middle.y, style)), End::Middle, style);
        let disc = Node::of(Role::Artifact, vec![disc, text]);
        body.nodes.insert(0, disc);
        body.high = body.high.max(2.0 * radius);
        body
    }

    /// The line of the guess with its values; on the key also what came out.
    fn scale(&self, guesses: &[GuessScale], kind: SheetKind, width: f64) -> Block {
        let Some(first) = guesses.first() else { return Block::default() };
        let (left, right) = (26.0, width - 26.0);
        let x = |share: f64| left + (right - left) * share.clamp(0.0, 1.0);
        let is_key = kind == SheetKind::Key;
        let lines = each_text(guesses, |guess| guess.result.as_ref().map(|mark| mark.text.clone())).len().max(1);
        let y = if is_key { 15.0 + NOTE.line_pt() * (lines - 1) as f64 } else { 12.0 };
        let mut pieces: Vec<Piece> = vec![straight(At::new(left, y), At::new(right, y), 1.0, Ink::Black)];
        let small = (0..=first.steps).filter(|_| first.steps > 0).map(|step| {
            let x = x(step as f64 / first.steps as f64);
            vec![At::new(x, y - 2.2), At::new(x, y + 2.2)]
        });
        pieces.push(line(small.collect(), 0.5, Ink::Rule));
        let tall =
            first.named.iter().map(|mark| vec![At::new(x(mark.share), y - 4.5), At::new(x(mark.share), y + 4.5)]);
        pieces.push(line(tall.collect(), 0.9, Ink::Black));
        let room = (right - left) / first.named.len().saturating_sub(1).max(1) as f64 - 4.0;
        let mut rows: f64 = 1.0;
        for (index, mark) in first.named.iter().enumerate() {
            let texts = each_text(guesses, |guess| guess.named.get(index).map(|mark| mark.text.clone()));
            rows = rows.max(texts.len() as f64);
            for (row, text) in texts.iter().enumerate() {
                let at = At::new(x(mark.share), y + 14.0 + NOTE.line_pt() * row as f64);
                pieces.push(letters(text, at, End::Middle, NOTE.fitting(text, room, 5.0)));
            }
        }
        let mut high = y + 14.0 + NOTE.line_pt() * rows - 4.0;
        if is_key {
            if let Some(mark) = &first.result {
                let x = x(mark.share);
                let wedge = vec![At::new(x - 4.5, y - 9.5), At::new(x + 4.5, y - 9.5), At::new(x, y - 1.0)];
                pieces.push(area(vec![wedge], Ink::Water));
            }
            if let Some(mark) = &first.usual {
                pieces.push(edged(vec![round(At::new(x(mark.share), y), 3.6)], Some(Ink::Paper), 1.1, Ink::Lack));
            }
        }
        let alt = each_text(guesses, |guess| {
            let (low, high) = (guess.named.first()?, guess.named.last()?);
            Some(format!("{} {} – {}", guess.question, low.text, high.text))
        });
        let mut block = Block::one(Node::of(Role::Figure(alt.join(" · ")), pieces), high);
        if is_key {
            block = block.below(4.0, self.outcome(guesses, width));
            high = block.high;
        }
        block.high = high;
        block
    }

    /// What came out and what most people say, in words beside their signs.
    fn outcome(&self, guesses: &[GuessScale], width: f64) -> Block {
        let column = column_pt(width, guesses.len());
        let mut block = Block::default();
        for (index, (guess, voice)) in guesses.iter().zip(self.voices).enumerate() {
            let mut pieces = Vec::new();
            let mut nodes = Vec::new();
            let mut x = 0.0;
            let mut entry = |id: &str, text: &str, sign: Piece, x: &mut f64| {
                pieces.push(sign);
                *x += 12.0;
                let text = format!("{}: {text}", voice.words.say(id, &[]));
                nodes.push(Node::of(Role::Paragraph, vec![letters(&text, At::new(*x, 9.5), End::Left, STRONG)]));
                *x += STRONG.width(&text) + 16.0;
            };
            let result =
                guess.result.as_ref().map_or_else(|| voice.words.say("tell-never", &[]), |mark| mark.text.clone());
            let wedge = area(vec![vec![At::new(0.0, 2.5), At::new(8.0, 2.5), At::new(4.0, 10.0)]], Ink::Water);
            entry("lesson-result", &result, wedge, &mut x);
            if let Some(usual) = &guess.usual {
                let disc = edged(vec![round(At::new(x + 4.5, 6.4), 3.6)], Some(Ink::Paper), 1.1, Ink::Lack);
                entry("lesson-usual", &usual.text, disc, &mut x);
            }
            nodes.insert(0, Node::of(Role::Artifact, pieces));
            let tag = (guesses.len() > 1).then(|| voice.words.tag().to_owned());
            nodes.iter_mut().for_each(|node| node.language.clone_from(&tag));
            let part = Block { nodes, high: 13.0 };
            // Two languages with long values stand one below the other.
            block = if x > column && index > 0 {
                block.below(1.0, part)
            } else {
                block.beside((column + GUTTER) * index as f64, part)
            };
        }
        block
    }

    /// A box for the guess of each group.
    fn boxes(&self, width: f64) -> Block {
        let gap = 7.0;
        let (own, high) = ((width - gap * (GROUPS - 1) as f64) / GROUPS as f64, 27.0);
        let mut frames = Vec::new();
        let mut nodes = Vec::new();
        for group in 0..GROUPS {
            let x = (own + gap) * group as f64;
            frames.push(corners(x, 0.0, own, high));
            let name =
                each(&self.words, |words| words.say("lesson-group", &[("group", (group + 1).into())])).join(" · ");
            let small = Style::new(Face::Regular, 6.8, Ink::Quiet).fitting(&name, own - 7.0, 4.5);
            nodes.push(Node::of(Role::Paragraph, vec![letters(&name, At::new(x + 3.5, 8.0), End::Left, small)]));
        }
        nodes.insert(0, Node::of(Role::Artifact, vec![edged(frames, None, 0.7, Ink::Rule)]));
        Block { nodes, high }
    }

    /// Words, and lines to write on after them.
    fn ruled(&self, id: &str, lines: usize, width: f64) -> Block {
        let text = each(&self.words, |words| words.say(id, &[])).join(" · ");
        let mut runs = Vec::new();
        for index in 0..lines {
            let y = RULED * (index + 1) as f64 - 7.0;
            let begin = if index == 0 { BODY.width(&text) + 6.0 } else { 0.0 };
            runs.push(vec![At::new(begin, y), At::new(width, y)]);
        }
        let ornament = Node::of(Role::Artifact, vec![line(runs, 0.5, Ink::Rule)]);
        let words = Node::of(Role::Paragraph, vec![letters(&text, At::new(0.0, RULED - 9.0), End::Left, BODY)]);
        Block { nodes: vec![ornament, words], high: RULED * lines as f64 - 5.0 }
    }
}

/// A text of every language's scale, without those that say the same again.
fn each_text(guesses: &[GuessScale], text: impl Fn(&GuessScale) -> Option<String>) -> Vec<String> {
    let mut said: Vec<String> = Vec::new();
    for text in guesses.iter().filter_map(text) {
        if !said.contains(&text) {
            said.push(text);
        }
    }
    said
}
