//! Numbers, units, dates and changes as each region writes them, table by table.

use chrono::{Month, NaiveDate};
use deshielo::words::{DateStyle, Quantity, System, Unit, Value, Words};
use proptest::prelude::*;

/// The thin gap that does not break across lines.
const GAP: &str = "\u{202F}";

fn words(tag: &str) -> Words {
    Words::new(tag).0
}

fn date(year: i32, month: u32, day: u32) -> NaiveDate {
    NaiveDate::from_ymd_opt(year, month, day).unwrap()
}

/// Writes the table's `_` for the thin gap.
fn gapped(text: &str) -> String {
    text.replace('_', GAP)
}

#[test]
fn marks_and_gaps_by_region() {
    let table = [
        // tag, 1.5, 12345, 1234, 1234567, 18 %
        ("en-US", "1.5", "12,345", "1,234", "1,234,567", "18%"),
        ("en-GB", "1.5", "12,345", "1,234", "1,234,567", "18%"),
        ("es-US", "1.5", "12_345", "1234", "1_234_567", "18_%"),
        ("es-MX", "1.5", "12_345", "1234", "1_234_567", "18_%"),
        ("es-CL", "1,5", "12_345", "1234", "1_234_567", "18_%"),
        ("es-AR", "1,5", "12_345", "1234", "1_234_567", "18_%"),
        ("es-ES", "1,5", "12_345", "1234", "1_234_567", "18_%"),
    ];
    for (tag, decimal, five, four, seven, percent) in table {
        let words = words(tag);
        assert_eq!(words.number(1.5, 1), decimal, "{tag}");
        assert_eq!(words.number(12_345.0, 0), gapped(five), "{tag}");
        assert_eq!(words.number(1_234.0, 0), four, "{tag}");
        assert_eq!(words.number(1_234_567.0, 0), gapped(seven), "{tag}");
        assert_eq!(words.percent(18.0, 0), gapped(percent), "{tag}");
        assert_eq!(words.number(-7.0, 0), "\u{2212}7", "{tag}: the true minus");
        assert_eq!(words.number(f64::NAN, 1), "–", "{tag}");
        assert_eq!(words.year(2026), "2026", "{tag}");
    }
}

#[test]
fn no_number_shows_exactly_three_decimals() {
    let words = words("en-US");
    assert_eq!(words.number(1.23456, 3), "1.23");
    assert_eq!(words.significant(1.23456, 4), "1.23");
    assert_eq!(words.number_signed(2.0, 1), "+2.0");
    assert_eq!(words.number_signed(-2.0, 0), "\u{2212}2");
    assert_eq!(words.number_signed(0.04, 1), "0.0");
    assert_eq!(words.number_range(18.2, 25.4, 2), "between 18 and 25");
}

#[test]
fn plurals_follow_what_is_written() {
    let table = [
        // number, decimals, English, Spanish of the US, Spanish of Chile
        (0.0, 0, "0 days", "0 días", "0 días"),
        (1.0, 0, "1 day", "1 día", "1 día"),
        (1.0, 1, "1 day", "1 día", "1 día"),
        (0.998, 1, "1 day", "1 día", "1 día"),
        (1.5, 1, "1.5 days", "1.5 días", "1,5 días"),
        (2.0, 0, "2 days", "2 días", "2 días"),
        (21.0, 0, "21 days", "21 días", "21 días"),
        (1e6, 0, "1,000,000 days", "1_000_000 días", "1_000_000 días"),
    ];
    for (number, decimals, english, american, chilean) in table {
        for (tag, expected) in [("en-US", english), ("es-US", american), ("es-CL", chilean)] {
            let said = words(tag).say("days-count", &[("n", Value::Number(number, decimals))]);
            assert_eq!(said, gapped(expected), "{tag} {number}");
        }
    }
}

#[test]
fn units_by_region() {
    // One line for each quantity: value in, then en-US, en-GB, es-US, es-CL in the region's own system.
    let table = [
        (Quantity::Temperature, 20.0, ["68_°F", "20_°C", "68_°F", "20_°C"]),
        (Quantity::StoredVolume, 12.0, ["9,730_ac-ft", "12,000_ML", "9730_ac-pie", "12_hm³"]),
        (Quantity::StoredVolume, 0.02, ["16.2_ac-ft", "20_ML", "16.2_ac-pie", "20_000_m³"]),
        (Quantity::Flow, 2.5, ["88.3_cfs", "2.5_m³/s", "88.3_pcs", "2,5_m³/s"]),
        (Quantity::Flow, 0.05, ["1.77_cfs", "50_L/s", "1.77_pcs", "50_L/s"]),
        (Quantity::Land, 100.0, ["247_acres", "100_ha", "247_acres", "100_ha"]),
        (Quantity::SnowWater, 254.0, ["10_in", "254_mm", "10_pulg", "254_mm"]),
        (Quantity::Elevation, 304.8, ["1,000_ft", "305_m", "1000_pies", "305_m"]),
        (Quantity::Elevation, 0.3048, ["1_ft", "0.3_m", "1_pie", "0,3_m"]),
    ];
    for (column, tag) in ["en-US", "en-GB", "es-US", "es-CL"].into_iter().enumerate() {
        let words = words(tag);
        for (quantity, value, expected) in table {
            assert_eq!(words.quantity(value, quantity, words.system(), 3), gapped(expected[column]), "{tag}");
        }
    }
}

#[test]
fn systems_by_region() {
    for (tag, system) in [
        ("en-US", System::Us),
        ("en-GB", System::Metric),
        ("es-US", System::Us),
        ("es-MX", System::Metric),
        ("es-CL", System::Metric),
        ("es-AR", System::Metric),
        ("es-ES", System::Metric),
        ("es-PE", System::Metric),
    ] {
        assert_eq!(words(tag).system(), system, "{tag}");
    }
}

#[test]
fn a_warming_is_a_difference() {
    let words = words("en-US");
    let quantity = |value, quantity| words.quantity(value, quantity, System::Us, 2);
    assert_eq!(quantity(2.0, Quantity::TemperatureChange), gapped("3.6_°F"));
    assert_eq!(quantity(2.0, Quantity::Temperature), gapped("36_°F"));
    assert_eq!(quantity(-40.0, Quantity::Temperature), gapped("\u{2212}40_°F"));
    assert_eq!(quantity(0.0, Quantity::TemperatureChange), gapped("0_°F"));
}

/// Conversions from the international foot (US NIST Special Publication 811, appendix B, from memory), to the printed
/// digits.
#[test]
fn conversions_agree_with_published_factors() {
    for (unit, value, expected, half_digit) in [
        (Unit::Acres, 1.0, 2.471, 5e-4),
        (Unit::AcreFeet, 1.0, 810.7, 5e-2),
        (Unit::AcreFeet, 1_233.481_837_547_520_2e-6, 1.0, 1e-12),
        (Unit::CubicFeetPerSecond, 1.0, 35.3147, 5e-5),
        (Unit::Inches, 25.4, 1.0, 1e-12),
        (Unit::Feet, 0.3048, 1.0, 1e-12),
        (Unit::Miles, 1.609_344, 1.0, 1e-12),
        (Unit::MilesPerHour, 0.447_04, 1.0, 1e-12),
        (Unit::SquareMiles, 2.589_988_110_336, 1.0, 1e-12),
        (Unit::LitresPerSecond, 0.028_316_846_592, 28.316_846_592, 1e-12),
        (Unit::Megalitres, 1.0, 1_000.0, 0.0),
        (Unit::CubicMetres, 1.0, 1e6, 0.0),
    ] {
        assert!((unit.convert(value) - expected).abs() <= half_digit, "{unit:?}: {}", unit.convert(value));
    }
}

#[test]
fn units_are_spelled_out_with_their_plural() {
    assert_eq!(words("en-US").amount_in_words(0.998, Unit::AcreFeet, 2), "1 acre-foot");
    assert_eq!(words("en-US").amount_in_words(300.0, Unit::AcreFeet, 2), "300 acre-feet");
    assert_eq!(words("es-US").amount_in_words(1.0, Unit::AcreFeet, 2), "1 acre-pie");
    assert_eq!(words("es-US").amount_in_words(300.0, Unit::AcreFeet, 2), "300 acre-pies");
    assert_eq!(words("es-CL").amount_in_words(1.5, Unit::Hectares, 2), "1,5 hectáreas");
    assert_eq!(words("es-US").unit(Quantity::Flow, System::Us), "pcs");
    assert_eq!(words("es-US").unit_name(Quantity::Flow, System::Us), "pies cúbicos por segundo");
    assert_eq!(words("en-GB").unit_name(Quantity::Elevation, System::Metric), "metres");
}

#[test]
fn dates_by_region() {
    let day = date(2026, 5, 9);
    for (tag, short, in_sentence, in_sentence_long, long) in [
        ("en-US", "May 9", "May 9", "May 9", "May 9, 2026"),
        ("en-GB", "9 May", "9 May", "9 May", "9 May 2026"),
        ("es-US", "9 may", "el 9 may", "el 9 de mayo", "9 de mayo de 2026"),
        ("es-MX", "9 may", "el 9 may", "el 9 de mayo", "9 de mayo de 2026"),
        ("es-CL", "9 may", "el 9 may", "el 9 de mayo", "9 de mayo de 2026"),
        ("es-AR", "9 may", "el 9 may", "el 9 de mayo", "9 de mayo de 2026"),
        ("es-ES", "9 may", "el 9 may", "el 9 de mayo", "9 de mayo de 2026"),
    ] {
        let words = words(tag);
        assert_eq!(words.date(day, DateStyle::Short), short, "{tag}");
        assert_eq!(words.date(day, DateStyle::InSentence), in_sentence, "{tag}");
        assert_eq!(words.date(day, DateStyle::InSentenceLong), in_sentence_long, "{tag}");
        assert_eq!(words.date(day, DateStyle::Long), long, "{tag}");
    }
    assert_eq!(words("es").date(date(2026, 6, 1), DateStyle::InSentenceLong), "el 1 de junio");
    assert_eq!(words("en-GB").date(date(2026, 9, 30), DateStyle::Short), "30 Sept");
    assert_eq!(words("es").date(date(2026, 9, 30), DateStyle::Short), "30 sep");
}

#[test]
fn months_on_charts() {
    let letters = |tag: &str| -> String {
        let words = words(tag);
        (1..=12).map(|month| words.month_letter(Month::try_from(month).unwrap())).collect()
    };
    assert_eq!(letters("en"), "JFMAMJJASOND");
    assert_eq!(letters("es"), "EFMAMJJASOND");
    assert_eq!(words("es").month_name(Month::January), "enero");
    assert_eq!(words("en").month_short(Month::September), "Sep");
}

#[test]
fn ranges_of_dates() {
    let within = (date(2026, 5, 9), date(2026, 5, 16));
    let across = (date(2026, 5, 28), date(2026, 6, 3));
    for (tag, same_month, two_months) in [
        ("en-US", "May 9 to 16", "May 28 to Jun 3"),
        ("en-GB", "9 to 16 May", "28 May to 3 Jun"),
        ("es-US", "entre el 9 y el 16 may", "entre el 28 may y el 3 jun"),
    ] {
        let words = words(tag);
        assert_eq!(words.date_range(within.0, within.1), same_month, "{tag}");
        assert_eq!(words.date_range(within.1, within.0), same_month, "{tag}: ends swapped");
        assert_eq!(words.date_range(across.0, across.1), two_months, "{tag}");
    }
    assert_eq!(words("en").date_range(within.0, within.0), "May 9");
}

#[test]
fn changes_in_plain_words() {
    let (en, es) = (words("en"), words("es"));
    for (days, english, spanish) in [
        (-18, "18 days sooner", "18 días antes"),
        (-1, "1 day sooner", "1 día antes"),
        (0, "Same day as before.", "El mismo día que antes."),
        (1, "1 day later", "1 día después"),
        (i32::MIN, "2,147,483,648 days sooner", "2_147_483_648 días antes"),
    ] {
        assert_eq!(en.days_change(days), english);
        assert_eq!(es.days_change(days), gapped(spanish));
    }
    for (a, b, english, spanish) in [
        (-25, -18, "between 18 and 25 days sooner", "entre 18 y 25 días antes"),
        (3, 7, "between 3 and 7 days later", "entre 3 y 7 días después"),
        (-3, 1, "from 3 days sooner to 1 day later", "desde 3 días antes hasta 1 día después"),
        (4, 4, "4 days later", "4 días después"),
    ] {
        assert_eq!(en.days_range(a, b), english);
        assert_eq!(en.days_range(b, a), english, "ends swapped");
        assert_eq!(es.days_range(a, b), spanish);
    }
    for (percent, english, spanish) in
        [(-18.4, "18% less", "18_% menos"), (12.5, "13% more", "13_% más"), (0.3, "No change.", "Sin cambio.")]
    {
        assert_eq!(en.percent_change(percent), english);
        assert_eq!(es.percent_change(percent), gapped(spanish));
    }
    assert_eq!(en.percent_range(-35.0, -20.0), "between 20 and 35% less");
    assert_eq!(es.percent_range(-20.0, -35.0), gapped("entre 20 y 35_% menos"));
    assert_eq!(en.percent_range(-5.0, 3.0), "from 5% less to 3% more");
    assert_eq!(es.amount_change(-12.0, Quantity::StoredVolume, System::Metric, 2), gapped("12_hm³ menos"));
}

#[test]
fn rounding_does_not_hide_the_one_bad_year() {
    let (en, es) = (words("en"), words("es"));
    assert_eq!(en.of_ten_years(0.9), "9 of 10 years");
    assert_eq!(es.of_ten_years(39.0 / 40.0), "9 de cada 10 años");
    assert_eq!(en.of_ten_years(1.0), "10 of 10 years");
    assert_eq!(en.of_ten_years(0.02), "1 of 10 years");
    assert_eq!(en.of_ten_years(0.0), "0 of 10 years");
    assert_eq!(en.shortage(0.18), "18 of each 100 parts do not arrive");
    assert_eq!(es.shortage(0.01), "de cada 100 partes, 1 no llega");
    assert_eq!(es.shortage(0.18), "de cada 100 partes, 18 no llegan");
    assert_eq!(en.shortage(0.002), "Less than 1 of each 100 parts does not arrive.");
    assert_eq!(es.shortage(0.0), "Llega toda el agua pedida.");
}

proptest! {
    #[test]
    fn written_numbers_read_back_to_half_of_their_last_digit(value in -1e12_f64..1e12, decimals in 0_u8..=2) {
        for (tag, mark) in [("en", '.'), ("es-CL", ',')] {
            let written = words_once(tag).number(value, decimals);
            let plain: String = written.chars().filter_map(|letter| match letter {
                '\u{2212}' => Some('-'),
                letter if letter == mark => Some('.'),
                letter => letter.is_ascii_digit().then_some(letter),
            }).collect();
            let half = 0.5 / 10_f64.powi(i32::from(decimals));
            prop_assert!((plain.parse::<f64>().unwrap() - value).abs() <= half * 1.000_001 + value.abs() * 1e-15, "{written}");
        }
    }

    #[test]
    fn any_number_can_be_written(bits: u64, digits: u8) {
        let value = f64::from_bits(bits);
        let words = words_once("es-CL");
        prop_assert!(!words.number(value, digits).is_empty());
        prop_assert!(!words.significant(value, digits).is_empty());
        prop_assert!(!words.quantity(value, Quantity::Flow, System::Us, digits).is_empty());
        prop_assert!(!words.percent_range(value, -value).is_empty());
        prop_assert!(!words.shortage(value).is_empty());
        prop_assert_eq!(words.take_errors(), []);
    }
}

/// Building the words once keeps the many cases of a property test quick.
fn words_once(tag: &str) -> &'static Words {
    use std::sync::OnceLock;
    static ENGLISH: OnceLock<Words> = OnceLock::new();
    static CHILEAN: OnceLock<Words> = OnceLock::new();
    if tag == "en" { ENGLISH.get_or_init(|| words("en")) } else { CHILEAN.get_or_init(|| words("es-CL")) }
}
