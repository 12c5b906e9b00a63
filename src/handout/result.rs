//! The page of a result: place, dials, what changed, the year, the canals, all years, the accounts, trust, cautions.

use super::cautions::cautions;
use super::chart::{canal_legend, each, season, strips, years};
use super::face::Face;
use super::flow::{Block, Flow, GUTTER};
use super::ledger::ledger;
use super::model::{At, Document, Ink, Node, Paper, Piece, Role};
use super::paragraph::{column_pt, heading, paragraph, side_by_side};
use super::pen::{BODY, End, NOTE, STRONG, Style, centred, corners, edged, letters};
use super::qr::{QrFault, code};
use super::table::{Cell, Column, Table, says_the_same};
use crate::picture::views::Answer;
use crate::picture::views::page_answer::PageAnswer;
use crate::picture::views::scene::{Scene, YearKind};
use crate::words::Words;

/// The signs as they are told to people: heads, then rows as wide.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct SignTable {
    /// What the columns are.
    pub heads: Vec<String>,
    /// Name of the sign, as it was, with the changes, change; or name and value where nothing is turned.
    pub rows: Vec<Vec<String>>,
}

/// What is told in one language.
#[derive(Clone, Debug)]
pub struct ResultVoice<'a> {
    /// The language.
    pub words: &'a Words,
    /// What is on show, with the names of this language.
    pub scene: Scene<'a>,
    /// Where every turned dial stands, and its name.
    pub dials: Vec<(String, String)>,
    /// The table.
    pub table: SignTable,
}

/// The page of a result, in one language or in two.
#[derive(Clone, Debug)]
pub struct ResultPage<'a> {
    /// The paper.
    pub paper: Paper,
    /// One or two languages.
    pub voices: Vec<ResultVoice<'a>>,
}

const TITLE: Style = Style::new(Face::Bold, 21.0, Ink::Black);
const LEAD: Style = Style::new(Face::Bold, 13.0, Ink::Black);
const SENTENCE: Style = Style::new(Face::Regular, 9.6, Ink::Black);
/// Side of the square code.
const CODE: f64 = 104.0;

/// Most pages that a result may take.
const MOST_PAGES: usize = 2;

/// How closely a page is set: the first of [`FITS`] that keeps to the pages is used.
#[derive(Clone, Copy, Debug)]
struct Fit {
    /// Letters of the table, points.
    table: f64,
    /// Letters of the sentence that opens a part, points.
    sentence: f64,
    /// Least and most height of the year's charts; they take what is left of the page.
    season: (f64, f64),
    /// Height of a canal's row.
    row: f64,
    /// Height of the chart of all the years.
    years: f64,
    /// Most lines on a side of the accounts.
    ledger: usize,
    /// Whether what is sure and what is not is said point by point.
    statements: bool,
    /// The attribute of the cautions, and the sizes that are tried.
    cautions: (&'static str, &'static [f64]),
    /// Between two parts.
    gap: f64,
}

const FITS: [Fit; 5] = [
    Fit {
        table: 8.6,
        sentence: 9.6,
        season: (230.0, 330.0),
        row: 19.0,
        years: 118.0,
        ledger: 12,
        statements: true,
        cautions: (".print", &[7.6, 7.0, 6.6]),
        gap: 12.0,
    },
    Fit {
        table: 8.6,
        sentence: 9.6,
        season: (230.0, 330.0),
        row: 17.0,
        years: 108.0,
        ledger: 8,
        statements: true,
        cautions: ("", &[8.2, 7.6, 7.2]),
        gap: 10.0,
    },
    Fit {
        table: 8.4,
        sentence: 9.2,
        season: (200.0, 330.0),
        row: 15.0,
        years: 94.0,
        ledger: 6,
        statements: true,
        cautions: ("", &[7.6, 7.2, 6.8]),
        gap: 9.0,
    },
    Fit {
        table: 7.6,
        sentence: 8.6,
        season: (170.0, 330.0),
        row: 14.0,
        years: 88.0,
        ledger: 6,
        statements: false,
        cautions: ("", &[7.2, 6.8, 6.6]),
        gap: 8.0,
    },
    Fit {
        table: 7.2,
        sentence: 8.2,
        season: (130.0, 330.0),
        row: 11.5,
        years: 78.0,
        ledger: 5,
        statements: false,
        cautions: ("", &[6.6, 6.2]),
        gap: 6.0,
    },
];

impl ResultPage<'_> {
    /// Lays the page out; `None` without a language.
    ///
    /// # Errors
    /// A [`QrFault`] where the result does not fit the square code.
    pub fn lay_out(&self) -> Result<Option<Document>, QrFault> {
        let Some(first) = self.voices.first() else { return Ok(None) };
        let sheet = Sheet::of(self);
        let mut flow = Flow::new(self.paper);
        for fit in FITS {
            flow = sheet.flow(self.paper, fit)?;
            if flow.page_count() <= MOST_PAGES {
                break;
            }
        }
        let always = each(&sheet.words, |words| words.say("handout-always", &[]));
        let number = |n: usize, of: usize| {
            let page = |words: &Words| words.say("page-sheet", &[("n", n.into()), ("of", of.into())]);
            format!("deshielo · {}", first_of(&sheet.words, page))
        };
        let title = first.words.say("handout-title", &[("place", first.scene.place_name.into())]);
        Ok(Some(flow.finish(title, first.words.tag().to_owned(), &always, &number)))
    }
}

fn first_of(voices: &[&Words], say: impl Fn(&Words) -> String) -> String {
    voices.first().map_or(String::new(), |words| say(words))
}

struct Sheet<'s, 'a> {
    page: &'s ResultPage<'a>,
    words: Vec<&'a Words>,
}

impl<'s, 'a> Sheet<'s, 'a> {
    fn of(page: &'s ResultPage<'a>) -> Self {
        Self { page, words: page.voices.iter().map(|voice| voice.words).collect() }
    }

    fn tags(&self) -> Vec<&'a str> {
        self.words.iter().map(|words| words.tag()).collect()
    }

    fn told(&self, say: impl Fn(&ResultVoice<'a>) -> String) -> Vec<(String, &'a str)> {
        self.page.voices.iter().map(|voice| (say(voice), voice.words.tag())).collect()
    }

    /// Every part, set as closely as `fit` says.
    fn flow(&self, paper: Paper, fit: Fit) -> Result<Flow, QrFault> {
        let mut flow = Flow::new(paper).with_foot_lines(self.words.len());
        let width = flow.width();
        let scene = &self.page.voices[0].scene;
        flow.put(self.masthead(width)?);
        flow.gap(fit.gap);
        let changed = if scene.changed() { "handout-changed" } else { "handout-numbers" };
        flow.put(self.heading(changed, width).below(3.0, self.table(width, fit.table)));
        flow.gap(fit.gap);
        flow.put(self.season(width, flow.room(), fit));
        flow.gap(fit.gap);
        if !scene.canals.is_empty() {
            flow.put(self.canals(width, fit));
            flow.gap(fit.gap);
        }
        let alt = self.alt("handout-years-alt", &Answer::Page(PageAnswer::years(scene)));
        let part = self
            .heading("handout-years", width)
            .below(1.0, self.sentences(width, fit.sentence, |scene| Answer::Page(PageAnswer::years(scene))))
            .below(3.0, years(scene, &self.words, width, fit.years, alt));
        flow.put(part);
        flow.gap(fit.gap);
        let part = self
            .heading("handout-ledger", width)
            .below(1.0, self.sentences(width, fit.sentence, |scene| Answer::Page(PageAnswer::ledger(scene))))
            .below(3.0, ledger(scene, &self.words, &self.tags(), width, fit.ledger));
        flow.put(part);
        flow.gap(fit.gap);
        flow.put(self.trust(width, fit));
        flow.gap(fit.gap);
        let head = self.heading("help-cautions", width);
        flow.put(cautions(head, &self.words, width, flow.room(), fit.cautions));
        Ok(flow)
    }

    /// The year: as high as what is left of the page, within what is still a chart.
    fn season(&self, width: f64, room: f64, fit: Fit) -> Block {
        let scene = &self.page.voices[0].scene;
        let head = self.heading("handout-season", width);
        let (least, most) = fit.season;
        let free = room - head.high - 3.0;
        let high = if free < least { least } else { free.min(most) };
        let alt = self.alt("handout-season-alt", &Answer::season(scene));
        head.below(3.0, season(scene, &self.words, width, high, alt))
    }

    fn canals(&self, width: f64, fit: Fit) -> Block {
        let scene = &self.page.voices[0].scene;
        let alt = self.alt("handout-canals-alt", &Answer::canals(scene));
        let legend = canal_legend(scene.changed(), &self.words, width);
        self.heading("handout-canals", width)
            .below(1.0, self.sentences(width, fit.sentence, Answer::canals))
            .below(3.0, legend)
            .below(1.0, strips(scene, &self.words, width, fit.row, alt))
    }

    fn heading(&self, id: &str, width: f64) -> Block {
        heading(&self.told(|voice| voice.words.say(id, &[])), width)
    }

    fn sentences(&self, width: f64, size: f64, answer: impl Fn(&Scene<'_>) -> Answer) -> Block {
        let texts = self.told(|voice| answer(&voice.scene).say(&voice.scene, voice.words));
        let style = Style { size, ..SENTENCE };
        side_by_side(&texts, width, |text, width| paragraph(text, width, style, Role::Paragraph))
    }

    /// The words of a figure: what it is, and what it shows.
    fn alt(&self, id: &str, answer: &Answer) -> String {
        let Some(voice) = self.page.voices.first() else { return String::new() };
        format!("{} {}", voice.words.say(id, &[]), answer.say(&voice.scene, voice.words))
    }

    /// Place, year, dials and the answer on the left, the code on the right.
    fn masthead(&self, width: f64) -> Result<Block, QrFault> {
        let Some(first) = self.page.voices.first() else { return Ok(Block::default()) };
        let left = width - CODE - GUTTER;
        let names = each(&self.words, |words| {
            let voice = self.page.voices.iter().find(|voice| voice.words.tag() == words.tag());
            voice.map_or(String::new(), |voice| voice.scene.place_name.to_owned())
        });
        let title = TITLE.fitting(&names.join(" · "), left * 2.0, 12.0);
        let mut block = paragraph(&names.join(" · "), left, title, Role::Heading(1));
        block = block.below(1.0, self.about(left));
        block = block.below(8.0, self.dials(left));
        let answers = self.told(|voice| lead(&voice.scene).say(&voice.scene, voice.words));
        block =
            block.below(8.0, side_by_side(&answers, left, |text, width| paragraph(text, width, LEAD, Role::Paragraph)));
        let texts = self.told(|voice| Answer::season(&voice.scene).say(&voice.scene, voice.words));
        // What the lead says already is not said again.
        if texts.iter().zip(&answers).all(|(text, lead)| text != lead) {
            let more = side_by_side(&texts, left, |text, width| paragraph(text, width, SENTENCE, Role::Paragraph));
            block = block.below(4.0, more);
        }
        let squares = code(&qr_text(first), CODE)?;
        let caption = self.told(|voice| voice.words.say("handout-code", &[]));
        let mut below = Block::default();
        for (text, tag) in &caption {
            let mut part = paragraph(text, CODE, NOTE, Role::Paragraph);
            part.nodes.iter_mut().for_each(|node| node.language = Some((*tag).to_owned()));
            below = below.below(1.0, part);
        }
        let alt = first.words.say("handout-code-alt", &[]);
        let mut square = Block::one(Node::of(Role::Figure(alt), vec![squares]), CODE).below(4.0, below);
        // Level with the capitals of the title.
        square.shift(0.0, 5.0);
        square.high += 5.0;
        Ok(block.beside(left + GUTTER, square))
    }

    /// The year on show, and what the place is.
    fn about(&self, width: f64) -> Block {
        let texts = self.told(|voice| {
            let scene = &voice.scene;
            let mut parts = vec![year_name(scene, voice.words)];
            if scene.invented {
                parts.push(voice.words.say("picture-invented", &[]));
            }
            parts.push(voice.words.say(scene.fitting(), &[]));
            parts.join(" · ")
        });
        let style = Style::new(Face::Regular, 9.0, Ink::Quiet);
        side_by_side(&texts, width, |text, width| paragraph(text, width, style, Role::Paragraph))
    }

    /// Each turned dial in a box of its own.
    fn dials(&self, width: f64) -> Block {
        let texts = self.told(|voice| match voice.dials.as_slice() {
            [] => voice.words.say("tell-dials-at-rest", &[]),
            _ => voice.words.say("tell-dials", &[]),
        });
        let head = side_by_side(&texts, width, |text, width| paragraph(text, width, BODY, Role::Paragraph));
        let columns = column_pt(width, self.page.voices.len());
        let mut boxes = Block::default();
        for (index, voice) in self.page.voices.iter().enumerate() {
            let part = dial_boxes(&voice.dials, columns, voice.words.tag());
            boxes = boxes.beside((columns + GUTTER) * index as f64, part);
        }
        head.below(3.0, boxes)
    }

    /// The table; in two languages each names the sign in a column of its own, and both share the values.
    fn table(&self, width: f64, size: f64) -> Block {
        let Some(first) = self.page.voices.first() else { return Block::default() };
        let row_of = |read: &dyn Fn(&SignTable) -> Option<Vec<String>>| -> Vec<Cell> {
            let rows: Vec<Vec<String>> =
                self.page.voices.iter().map(|voice| read(&voice.table).unwrap_or_default()).collect();
            let said = |at: usize| rows.iter().map(move |row| row.get(at).cloned().unwrap_or_default());
            let names = said(0).enumerate().map(|(voice, name)| {
                let mut cell = vec![String::new(); voice];
                cell.push(name);
                cell
            });
            let values = (1..first.table.heads.len()).map(|at| vec![joined(said(at))]);
            names.chain(values).collect()
        };
        let heads = row_of(&|table| Some(table.heads.clone()));
        let rows: Vec<Vec<Cell>> =
            (0..first.table.rows.len()).map(|row| row_of(&|table| table.rows.get(row).cloned())).collect();
        // Two names on a line leave less room for each.
        let names = self.page.voices.len();
        let size = if names > 1 { size.min(7.2) } else { size };
        let (plain, quiet) = (Style { size, ..BODY }, Style::new(Face::Regular, size, Ink::Quiet));
        let columns: Vec<Column> = (0..heads.len())
            .map(|at| match at {
                at if at < names => Column { end: End::Left, style: plain },
                at if at == names && first.table.heads.len() > 2 => Column { end: End::Right, style: quiet },
                _ => Column { end: End::Right, style: Style { size, ..STRONG } },
            })
            .collect();
        Table { columns: &columns, heads: &heads, rows: &rows, tags: &self.tags() }.lay_out(width)
    }

    /// How far the page may be trusted: one sentence, then what holds, what holds in part and what does not.
    fn trust(&self, width: f64, fit: Fit) -> Block {
        let mut block = self
            .heading("handout-trust", width)
            .below(1.0, self.sentences(width, fit.sentence, |scene| Answer::Page(PageAnswer::trust(scene))));
        let rows =
            [("page-yes", "page-trust-direction"), ("page-partly", "page-trust-size"), ("page-no", "page-trust-exact")];
        for (holds, id) in rows.into_iter().filter(|_| fit.statements) {
            let texts = self.told(|voice| {
                let say = |id: &str| voice.words.say(id, &[]);
                format!("{}: {}. {}", say(id), say(holds).to_lowercase(), say(&format!("{id}.plain")))
            });
            block = block
                .below(1.0, side_by_side(&texts, width, |text, width| paragraph(text, width, BODY, Role::Paragraph)));
        }
        block
    }
}

fn dial_boxes(dials: &[(String, String)], width: f64, tag: &str) -> Block {
    let (name_style, value_style) = (BODY, Style::new(Face::Bold, 10.5, Ink::Black));
    let (pad, high, gap) = (6.0, 19.0, 5.0);
    let mut ornament: Vec<Piece> = Vec::new();
    let mut nodes = Vec::new();
    let (mut x, mut y) = (0.0, 0.0);
    for (name, value) in dials {
        let own = name_style.width(name) + 6.0 + value_style.width(value) + 2.0 * pad;
        let own = own.min(width);
        if x > 0.0 && x + own > width {
            (x, y) = (0.0, y + high + gap);
        }
        ornament.push(edged(vec![corners(x, y, own, high)], None, 0.7, Ink::Rule));
        let middle = y + high / 2.0;
        let room = own - 2.0 * pad - value_style.width(value) - 6.0;
        let name_fit = name_style.fitting(name, room, 5.0);
        let named = format!("{name}: ");
        let name_at = At::new(x + pad, centred(middle, name_fit));
        let value_at = At::new(x + own - pad, centred(middle, value_style));
        let pieces =
            vec![letters(&named, name_at, End::Left, name_fit), letters(value, value_at, End::Right, value_style)];
        nodes.push(Node::of(Role::Paragraph, pieces).in_language(Some(tag.to_owned())));
        x += own + gap;
    }
    if nodes.is_empty() {
        return Block::default();
    }
    nodes.insert(0, Node::of(Role::Artifact, ornament));
    Block { nodes, high: y + high }
}

/// What is said in every language on one line, without what is the same but for its marks.
fn joined(said: impl Iterator<Item = String>) -> String {
    let mut parts: Vec<String> = Vec::new();
    for text in said {
        if !parts.iter().any(|other| says_the_same(other, &text)) {
            parts.push(text);
        }
    }
    parts.join(" · ")
}

/// What the page says first: what changed, or when half of the water is past where nothing did.
fn lead(scene: &Scene<'_>) -> Answer {
    if scene.changed() { Answer::valley(scene) } else { Answer::season(scene) }
}

fn year_name(scene: &Scene<'_>, words: &Words) -> String {
    let Some(first) = scene.year.calendar.first() else { return String::new() };
    let id = match scene.year.kind {
        YearKind::Dry => "picture-year-dry",
        YearKind::Middling => "picture-year-middling",
        YearKind::Wet => "picture-year-wet",
        YearKind::Any => "picture-year-any",
    };
    words.say(id, &[("year", words.year(first.water_year).into())])
}

/// What the square code says: the result in a few plain lines.
pub fn qr_text(voice: &ResultVoice<'_>) -> String {
    let (scene, words) = (&voice.scene, voice.words);
    let mut lines = vec![format!("{}: {}", scene.place_name, year_name(scene, words))];
    match voice.dials.as_slice() {
        [] => lines.push(words.say("tell-dials-at-rest", &[])),
        dials => lines.extend(dials.iter().map(|(name, value)| format!("{name}: {value}"))),
    }
    let mut answers = vec![lead(scene), Answer::season(scene), Answer::Page(PageAnswer::years(scene))];
    answers.dedup();
    lines.extend(answers.iter().map(|answer| answer.say(scene, words)));
    lines.push(words.say("caution-not-a-forecast", &[]));
    // A blank that does not break means nothing there.
    lines.join("\n").replace(['\u{202f}', '\u{a0}', '\u{2009}'], " ")
}
