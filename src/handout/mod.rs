//! Pages to carry home: plain page data laid out as vectors, and written as PDF, SVG or PNG.
//!
//! A [`ResultPage`] or a [`LessonSheet`] is laid out into a [`Document`]: pages of lines, areas and letters under a tree
//! that says what each of them is (a heading, a cell of a table, a figure with its words). Three writers take a document
//! and know nothing of what is told on it. What was is dashed and what is with your changes is solid, lack is hatched and
//! always said in words too, so that a page survives a black-and-white printer.

mod cautions;
mod chart;
mod face;
mod flow;
mod ledger;
mod lesson_sheet;
mod model;
mod paragraph;
mod pdf;
mod pen;
mod png;
mod qr;
mod result;
mod svg;
mod table;

pub use lesson_sheet::{GuessScale, LessonSheet, ScaleMark, SheetKind, SheetStep, SheetVoice};
pub use model::{Document, Paper};
pub use pdf::{PdfFault, write_pdf};
pub use png::{PngFault, write_png};
pub use qr::QrFault;
pub use result::{ResultPage, ResultVoice, SignTable, qr_text};
pub use svg::write_svg;
