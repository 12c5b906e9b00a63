//! Records broken in their letters, cells, names, dates and gaps.

use deshielo::place::problem::Location;
use deshielo::place::record::{
    ColumnPlan, DateOrder, DatePlan, Encoding, GapFill, GapRule, Measure, MeasureUnit, RecordPlan,
};

/// A broken record and everything that must be said of it: message, line, column.
pub struct Broken {
    pub name: &'static str,
    pub plan: RecordPlan,
    pub bytes: Vec<u8>,
    pub expected: Vec<(&'static str, usize, usize)>,
}

pub fn broken(
    name: &'static str,
    plan: RecordPlan,
    text: impl AsRef<[u8]>,
    expected: &[(&'static str, usize, usize)],
) -> Broken {
    Broken { name, plan, bytes: text.as_ref().to_vec(), expected: expected.to_vec() }
}

/// A column `date`, then `t` in °C and `p` in mm.
pub fn plain() -> RecordPlan {
    in_order(DateOrder::YearMonthDay)
}

pub fn in_order(order: DateOrder) -> RecordPlan {
    let columns = vec![
        ColumnPlan::new("t", Measure::TemperatureMean, MeasureUnit::Celsius),
        ColumnPlan::new("p", Measure::Precipitation, MeasureUnit::Millimetre),
    ];
    RecordPlan::new("days.csv", DatePlan::Column { name: "date".into(), order }, columns)
}

fn filled_by(how: GapFill, longest_days: usize) -> RecordPlan {
    let mut plan = plain();
    plan.columns[1].gaps = GapRule { how, longest_days };
    plan
}

pub fn all() -> Vec<Broken> {
    [file(), columns(), cells(), dates(), gaps()].into_iter().flatten().collect()
}

fn file() -> Vec<Broken> {
    let latin1_header = b"date,t,p,\xF1\n2001-01-01,1,2,x\n";
    let read_as_latin1 = RecordPlan { encoding: Encoding::Latin1, ..plain() };
    vec![
        broken("nothing at all", plain(), "", &[("problem-record-empty", 0, 0)]),
        broken("only comments", plain(), "# a\n\n#b\n", &[("problem-record-empty", 0, 0)]),
        broken(
            "skipped to the end",
            RecordPlan { skip_lines: 99, ..plain() },
            "date,t,p\n",
            &[("problem-record-empty", 0, 0)],
        ),
        broken("header only", plain(), "\n# note\ndate,t,p\n\n", &[("problem-record-no-days", 3, 0)]),
        broken("spreadsheet", plain(), b"PK\x03\x04\x14\x00", &[("problem-record-spreadsheet", 1, 0)]),
        broken("two bytes a letter", plain(), b"\xFF\xFEd\x00a\x00", &[("problem-record-two-byte-text", 1, 0)]),
        broken("Latin-1 taken for UTF-8", plain(), latin1_header, &[("problem-record-not-utf8", 1, 10)]),
        broken(
            "a bad byte far down, and another mistake still seen",
            plain(),
            b"date,t,p\n2001-01-01,1,2\n2001-01-02,x,2\n2001-01-03,1,\xFF\n",
            &[("problem-record-not-utf8", 4, 14), ("problem-record-number", 3, 12), ("problem-record-number", 4, 14)],
        ),
        broken(
            "Latin-1 column with a fault behind an ñ",
            read_as_latin1,
            b"\xF1,date,t,p\n\xF1\xF1,2001-01-01,uno,2\n",
            &[("problem-record-number", 2, 15)],
        ),
        broken("no delimiter", plain(), "date t p\n2001-01-01 1 2\n", &[("problem-record-delimiter", 1, 0)]),
        broken(
            "a quotation mark left open swallows nothing behind its line",
            plain(),
            "date,t,p\n2001-01-01,\"1,2\n2001-01-02,1,2\n2001-01-03,z,2\n",
            &[("problem-record-quote-open", 2, 12), ("problem-record-number", 4, 12)],
        ),
        broken("open in the header", plain(), "date,\"t,p\n", &[("problem-record-quote-open", 1, 6)]),
        broken(
            "text behind a quoted cell",
            plain(),
            "date,t,p\n2001-01-01,\"1\"x,2\n",
            &[("problem-record-quote-behind", 2, 15)],
        ),
        broken("too few cells", plain(), "date,t,p\n2001-01-01,1\n", &[("problem-record-cells-few", 2, 0)]),
        broken(
            "decimal commas between commas",
            plain(),
            "date,t,p\n2001-01-01,1,5,2,5\n",
            &[("problem-record-cells-many", 2, 16)],
        ),
    ]
}

fn columns() -> Vec<Broken> {
    let declared_at = Location { file: "place.toml".into(), line: 12, column: 5, length: 4 };
    let mut wrong_unit = plain();
    wrong_unit.columns[1].unit = MeasureUnit::Fahrenheit;
    wrong_unit.columns[1].declared_at = Some(declared_at.clone());
    let mut twin = plain();
    twin.columns.push(ColumnPlan::new("t2", Measure::TemperatureMean, MeasureUnit::Celsius));
    let mut elsewhere = plain();
    elsewhere.columns[0].declared_at = Some(declared_at);
    let mut nothing = plain();
    nothing.columns.clear();
    let day = "date,t,p\n2001-01-01,1,2\n";
    vec![
        broken("no columns planned", nothing, day, &[("problem-record-no-columns", 0, 0)]),
        broken("unit of another measure", wrong_unit, day, &[("problem-record-unit", 12, 5)]),
        broken("one measure twice", twin, "date,t,p,t2\n2001-01-01,1,2,3\n", &[("problem-record-measure-twice", 0, 0)]),
        broken(
            "two columns missing, both told",
            plain(),
            "# note\ndate,temp,rain\n2001-01-01,1,2\n",
            &[("problem-record-column-missing", 2, 0), ("problem-record-column-missing", 2, 0)],
        ),
        broken(
            "column missing, told where it is declared",
            elsewhere,
            "date,temp,p\n2001-01-01,1,2\n",
            &[("problem-record-column-missing", 12, 5)],
        ),
        broken("no date column", plain(), "day,t,p\n2001-01-01,1,2\n", &[("problem-record-column-missing", 1, 0)]),
        broken("one name twice", plain(), "date,t,p, T\n2001-01-01,1,2,3\n", &[("problem-record-column-twice", 1, 11)]),
    ]
}

fn cells() -> Vec<Broken> {
    let cell = |text: &str| format!("date,t,p\n2001-01-01,1,2\n2001-01-02,  {text} ,2\n");
    let comma = || RecordPlan { decimal_comma: true, ..plain() };
    let only = |message| vec![(message, 3, 14)];
    let many: String = (1..=28).map(|day| format!("2001-02-{day:02},?,0\n")).collect();
    let mut flooded: Vec<_> = (2..=21).map(|line| ("problem-record-number", line, 12)).collect();
    flooded.push(("problem-record-more", 22, 12));
    vec![
        broken("a word", plain(), cell("ice"), &only("problem-record-number")),
        broken("a number that is no number", plain(), cell("NaN"), &only("problem-record-number")),
        broken("thousands", plain(), cell("\"1,234.5\""), &only("problem-record-number-thousands")),
        broken("a comma", plain(), cell("\"1,5\""), &only("problem-record-number-comma")),
        broken(
            "a point where commas are declared",
            comma(),
            "date;t;p\n2001-01-01;1;2\n2001-01-02;  1.5 ;2\n",
            &only("problem-record-number-point"),
        ),
        broken("a unit behind", plain(), cell("1.5 °C"), &only("problem-record-number-tail")),
        broken("a trace", plain(), "date,t,p\n2001-01-01,1,T\n", &[("problem-record-number-trace", 2, 14)]),
        broken("a mark nobody declared", plain(), cell("-9999"), &only("problem-record-undeclared-missing")),
        broken("every row wrong", plain(), format!("date,t,p\n{many}"), &flooded),
    ]
}

fn dates() -> Vec<Broken> {
    let row = |date: &str| format!("date,t,p\n{date},1,2\n");
    let rows = |dates: &[&str]| -> String {
        let rows: String = dates.iter().map(|date| format!("{date},1,2\n")).collect();
        format!("date,t,p\n{rows}")
    };
    let short: String = (1..=5).map(|day| format!("{day}/1/2001,1,2\n")).collect();
    let may: Vec<String> = (1..=19).map(|day| format!("{day:02}/05/2001")).collect();
    let may: Vec<&str> = may.iter().map(String::as_str).collect();
    let one = |message| vec![(message, 2, 1)];
    let month_first = || in_order(DateOrder::MonthDayYear);
    let parts =
        RecordPlan { date: DatePlan::Parts { year: "y".into(), month: "m".into(), day: "d".into() }, ..plain() };
    let year_and_day =
        RecordPlan { date: DatePlan::YearAndDay { year: "y".into(), day_of_year: "d".into() }, ..plain() };
    vec![
        broken("no date", plain(), row("soon"), &one("problem-record-date-unreadable")),
        broken("30 February", plain(), row("2001-02-30"), &one("problem-record-date-no-such-day")),
        broken(
            "30 February among good days is that day and no hole",
            plain(),
            rows(&["2001-02-27", "2001-02-30", "2001-03-01"]),
            &[("problem-record-date-no-such-day", 3, 1)],
        ),
        broken("year of two digits", month_first(), row("5/13/01"), &one("problem-record-date-short-year")),
        broken("a time of day", plain(), row("2001-01-01 07:00"), &one("problem-record-date-time")),
        broken("year 201", plain(), row("0201-01-01"), &one("problem-record-date-far-year")),
        broken("13 May as month 13", month_first(), rows(&may), &[("problem-record-date-order", 14, 1)]),
        broken(
            "few days, all of them readable both ways",
            month_first(),
            format!("date,t,p\n{short}"),
            &[("problem-record-date-order", 3, 1)],
        ),
        broken(
            "year first where the day was declared first",
            in_order(DateOrder::DayMonthYear),
            rows(&["2001-01-01", "2001-01-02"]),
            &one("problem-record-date-order"),
        ),
        broken(
            "day and month swapped, and a hole seen all the same",
            month_first(),
            rows(&[&may[..15], &may[17..]].concat()),
            &[("problem-record-date-order", 14, 1), ("problem-record-days-missing", 17, 1)],
        ),
        broken(
            "one day wrong in three columns",
            parts,
            "t,p,y,m,d\n1,2,2001,2,28\n1,2,2001,2,29\n",
            &[("problem-record-date-no-such-day", 3, 5)],
        ),
        broken(
            "day 366 of a common year",
            year_and_day,
            "y,d,t,p\n2001,366,1,2\n",
            &one("problem-record-date-no-such-day"),
        ),
        broken(
            "a day twice",
            plain(),
            rows(&["2001-01-01", "2001-01-02", "2001-01-02", "2001-01-03"]),
            &[("problem-record-day-twice", 4, 1)],
        ),
        broken(
            "a day too late in the file",
            plain(),
            rows(&["2001-01-01", "2001-01-03", "2001-01-02", "2001-01-04"]),
            &[("problem-record-day-out-of-order", 4, 1)],
        ),
        broken(
            "newest first, with a hole",
            plain(),
            rows(&["2001-01-05", "2001-01-04", "2001-01-02"]),
            &[("problem-record-newest-first", 3, 1), ("problem-record-days-missing", 4, 1)],
        ),
        broken(
            "two holes, blank lines and comments between",
            plain(),
            "date,t,p\n\n2001-01-01,1,2\n# gone\n2001-01-04,1,2\n,,\n2001-01-05,1,2\n2001-01-07,1,2\n",
            &[("problem-record-days-missing", 5, 1), ("problem-record-days-missing", 8, 1)],
        ),
        broken(
            "months and not days",
            plain(),
            rows(&["2001-01-01", "2001-02-01", "2001-03-01", "2001-04-01", "2001-05-01", "2001-06-01"]),
            &[("problem-record-not-daily", 3, 1)],
        ),
        broken(
            "a calendar without leap days",
            plain(),
            rows(&["2004-02-28", "2004-03-01"]),
            &[("problem-record-leap-day-missing", 3, 1)],
        ),
        broken(
            "CRLF and a byte-order mark do not move the column",
            plain(),
            "\u{FEFF}p;t;date\r\n1;2;2001-01-01\r\n1;2;2001-01-01\r\n",
            &[("problem-record-day-twice", 3, 5)],
        ),
    ]
}

fn gaps() -> Vec<Broken> {
    let days = |cells: &[&str]| -> String {
        let rows: String =
            cells.iter().enumerate().map(|(index, cell)| format!("2001-01-{:02},{cell}\n", index + 1)).collect();
        format!("date,t,p\n{rows}")
    };
    let kept = filled_by(GapFill::Keep, 0);
    vec![
        broken("rain missing", plain(), days(&["1,2", "1,", "1,2"]), &[("problem-record-gap-refused", 3, 14)]),
        broken(
            "six days without temperature",
            plain(),
            days(&["1,2", ",2", ",2", ",2", ",2", ",2", ",2", "1,2"]),
            &[("problem-record-gap-long", 3, 12)],
        ),
        broken(
            "no temperature at either end",
            plain(),
            days(&[",2", "1,2", ",2"]),
            &[("problem-record-gap-at-end", 2, 12), ("problem-record-gap-at-end", 4, 12)],
        ),
        broken(
            "no mean to fill with",
            filled_by(GapFill::Mean, 5),
            "date,t,p\n2001-01-31,1,2\n2001-02-01,1,\n",
            &[("problem-record-gap-no-mean", 3, 14)],
        ),
        broken("a column without values", plain(), days(&["1,", "1,"]), &[("problem-record-column-empty", 2, 14)]),
        broken("the same, only compared with", kept, days(&["1,", "1,"]), &[("problem-record-column-empty", 2, 14)]),
    ]
}
