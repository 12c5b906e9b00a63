//! What a column measures, guessed from the words of its name in English, Spanish or the CF standard names.
//!
//! Only a guess: whoever asks shows it to people, with the words that led to it.

use super::record::Measure;

/// Starts of words that say lowest, highest and mean.
const LOWEST: [&str; 6] = ["min", "low", "cold", "mn", "menor", "baja"];
const HIGHEST: [&str; 7] = ["max", "high", "warm", "hot", "mx", "mayor", "alta"];
const MEAN: [&str; 6] = ["mean", "avg", "average", "med", "prom", "ave"];

/// The words of a name: small letters without accents, cut at everything that is no letter or digit and where a capital
/// follows a small letter.
fn words_of(name: &str) -> Vec<String> {
    let mut words = vec![String::new()];
    let mut before_small = false;
    for letter in name.chars() {
        if !letter.is_alphanumeric() || (letter.is_uppercase() && before_small) {
            words.push(String::new());
        }
        before_small = letter.is_lowercase();
        if letter.is_alphanumeric() {
            let last = words.len() - 1;
            words[last].extend(letter.to_lowercase().map(without_accent));
        }
    }
    words.retain(|word| !word.is_empty());
    words
}

fn without_accent(letter: char) -> char {
    match letter {
        'á' | 'à' | 'â' | 'ã' => 'a',
        'é' | 'ê' => 'e',
        'í' => 'i',
        'ó' | 'õ' | 'ô' => 'o',
        'ú' | 'ü' => 'u',
        'ñ' => 'n',
        'ç' => 'c',
        letter => letter,
    }
}

/// The measure that the words of `name` speak of; `None` where they speak of none or of something that a record cannot
/// have (depth of snow, direction of wind, temperature of the soil).
pub fn measure_of_words(name: &str) -> Option<Measure> {
    let words = words_of(name);
    let starts = |list: &[&str]| words.iter().any(|word| list.iter().any(|start| word.starts_with(start)));
    let is = |list: &[&str]| words.iter().any(|word| list.contains(&word.as_str()));
    let extreme = || {
        if starts(&LOWEST) {
            Some(false)
        } else if starts(&HIGHEST) {
            Some(true)
        } else {
            None
        }
    };
    if starts(&["dir", "gust", "racha", "rafaga", "flag", "qual", "calid", "attribut"]) || is(&["qc"]) {
        return None;
    }
    if starts(&["dew", "rocio", "tdew"]) || is(&["tdp", "td"]) {
        return Some(Measure::DewPoint);
    }
    let of_snow = starts(&["snow", "nieve", "nival"]);
    if starts(&["swe", "wteq"]) || (of_snow && (starts(&["water", "agua", "equiv"]) || is(&["amount", "lwe"]))) {
        return Some(Measure::SnowWater);
    }
    if of_snow || is(&["snwd", "snd"]) {
        return None;
    }
    let of_humidity = starts(&["hum", "rh", "hr"]) || is(&["hurs"]);
    if of_humidity {
        let low = is(&["rhmin", "hrmin", "rhmn"]) || starts(&LOWEST);
        let high = is(&["rhmax", "hrmax", "rhmx"]) || starts(&HIGHEST);
        return Some(match (low, high) {
            (true, _) => Measure::RelativeHumidityMin,
            (_, true) => Measure::RelativeHumidityMax,
            _ => Measure::RelativeHumidityMean,
        });
    }
    if starts(&["vapor", "vapour"]) || is(&["vp", "ea"]) {
        return Some(Measure::VapourPressure);
    }
    if starts(&["wind", "viento", "wnd", "sfcwind"]) || is(&["ws", "u2"]) {
        return Some(Measure::Wind);
    }
    if starts(&["sunsh", "insol", "heliof", "sunhour"]) {
        return Some(Measure::Sunshine);
    }
    if starts(&["solar", "radia", "srad", "rsds", "shortwave"]) || is(&["rs", "swdown"]) {
        return Some(Measure::Solar);
    }
    if starts(&["eto", "et0", "evap", "refet", "etref"]) || is(&["et", "etp", "pet", "etr"]) {
        return Some(Measure::ReferenceEvaporation);
    }
    if starts(&["inflow", "aportac", "entrada", "afluen"]) {
        return Some(Measure::ComputedInflow);
    }
    if starts(&["divers", "deriv", "canal", "acequia", "withdraw", "ditch"]) {
        return Some(Measure::Diversion);
    }
    if starts(&["outflow", "release", "extraccion", "salida", "desfogue"]) {
        return None;
    }
    if starts(&["flow", "disch", "streamf", "caudal", "gasto", "river", "rio", "escurr"])
        || is(&["q", "qobs", "00060", "qd", "cfs", "m3s", "cms"])
    {
        return Some(Measure::Flow);
    }
    if starts(&["stor", "almacen", "volum", "content"]) {
        return Some(Measure::Storage);
    }
    if starts(&["prec", "prcp", "ppt", "rain", "lluvia", "pluv", "pcp"]) || is(&["pp", "pr", "p", "rr", "lwe"]) {
        return Some(Measure::Precipitation);
    }
    if starts(&["soil", "suelo", "water", "agua", "ground"]) {
        return None;
    }
    if is(&["tmin", "tmn", "tn", "tasmin", "mint"]) || starts(&["tempmin", "mintemp"]) {
        return Some(Measure::TemperatureMin);
    }
    if is(&["tmax", "tmx", "tx", "tasmax", "maxt"]) || starts(&["tempmax", "maxtemp"]) {
        return Some(Measure::TemperatureMax);
    }
    if is(&["tmean", "tavg", "tmed", "tm", "tas", "tmp", "tprom"]) {
        return Some(Measure::TemperatureMean);
    }
    let named = words.iter().filter(|word| !["f", "c", "deg", "degf", "degc"].contains(&word.as_str())).count();
    // A bare "minimum" beside no other word that could be measured is a temperature in every station's table.
    if starts(&["temp", "air", "aire"]) || is(&["t"]) || (named == 1 && (starts(&LOWEST[..2]) || starts(&HIGHEST[..2])))
    {
        return match extreme() {
            Some(false) => Some(Measure::TemperatureMin),
            Some(true) => Some(Measure::TemperatureMax),
            None if starts(&MEAN) || starts(&["temp"]) || is(&["t"]) => Some(Measure::TemperatureMean),
            None => None,
        };
    }
    None
}

/// Whether the words of `name` speak of a date.
pub(super) fn speaks_of_date(name: &str) -> bool {
    let words = words_of(name);
    words.iter().any(|word| ["date", "fecha", "day", "dia", "datetime", "time", "timestamp"].contains(&word.as_str()))
}

/// What part of a date the words of `name` speak of.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum DatePart {
    Year,
    Month,
    Day,
    DayOfYear,
}

/// The part of a date that a column of this name holds.
pub(super) fn date_part(name: &str) -> Option<DatePart> {
    let words = words_of(name);
    let is = |list: &[&str]| words.iter().any(|word| list.contains(&word.as_str()));
    if is(&["doy", "jday", "yday", "julian", "juliano"]) || (is(&["day", "dia"]) && is(&["year", "ano"])) {
        return Some(DatePart::DayOfYear);
    }
    if is(&["year", "ano", "yr", "yyyy", "anio"]) {
        return Some(DatePart::Year);
    }
    if is(&["month", "mes", "mon", "mm", "mo"]) {
        return Some(DatePart::Month);
    }
    is(&["day", "dia", "dd", "dy"]).then_some(DatePart::Day)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_of_many_offices_are_understood() {
        use Measure::*;
        for (name, measure) in [
            ("tmin_c", Some(TemperatureMin)),
            ("TMAX (°F)", Some(TemperatureMax)),
            ("Temperatura mínima", Some(TemperatureMin)),
            ("Max Air Temp", Some(TemperatureMax)),
            ("temp_avg", Some(TemperatureMean)),
            ("Temp Max", Some(TemperatureMax)),
            ("tempMin", Some(TemperatureMin)),
            ("min", Some(TemperatureMin)),
            ("High", Some(TemperatureMax)),
            ("PRCP", Some(Precipitation)),
            ("Lluvia (mm)", Some(Precipitation)),
            ("Precipitación", Some(Precipitation)),
            ("WTEQ.I-1 (in)", Some(SnowWater)),
            ("Snow Water Equivalent (in)", Some(SnowWater)),
            ("Nieve, equivalente en agua", Some(SnowWater)),
            ("Snow Depth (in)", None),
            ("SNWD", None),
            ("HR media %", Some(RelativeHumidityMean)),
            ("rh_min", Some(RelativeHumidityMin)),
            ("Humedad relativa máxima", Some(RelativeHumidityMax)),
            ("Punto de rocío", Some(DewPoint)),
            ("Wind speed", Some(Wind)),
            ("Wind direction", None),
            ("Velocidad del viento", Some(Wind)),
            ("Radiación solar", Some(Solar)),
            ("Insolación", Some(Sunshine)),
            ("ETo (mm)", Some(ReferenceEvaporation)),
            ("Caudal medio diario", Some(Flow)),
            ("Discharge, cubic feet per second", Some(Flow)),
            ("Inflow_cfs", Some(ComputedInflow)),
            ("Almacenamiento (hm3)", Some(Storage)),
            ("Canal Norte", Some(Diversion)),
            ("soil temp", None),
            ("air_temperature time: maximum tasmax", Some(TemperatureMax)),
            ("precipitation_flux", Some(Precipitation)),
            ("water_volume_transport_in_river_channel", Some(Flow)),
            ("lwe_thickness_of_surface_snow_amount", Some(SnowWater)),
            ("elevation", None),
            ("station", None),
            ("", None),
        ] {
            assert_eq!(measure_of_words(name), measure, "{name}");
        }
        assert_eq!(date_part("AÑO"), Some(DatePart::Year));
        assert_eq!(date_part("day_of_year"), Some(DatePart::DayOfYear));
        assert_eq!(date_part("mes"), Some(DatePart::Month));
        assert!(speaks_of_date("Fecha") && !speaks_of_date("tmin"));
    }
}
