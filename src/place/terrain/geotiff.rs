//! Heights in a GeoTIFF (OGC 19-008r4): one band, upright, with its coordinates in the file.

use std::io::Cursor;
use std::path::Path;

use tiff::decoder::{Decoder, DecodingResult, Limits};
use tiff::tags::Tag;

use super::coordinates::{Coordinates, Geometry};
use super::esri_ascii::MOST_SIDE;
use super::{CellSource, HeightUnit, TerrainFiles, whole};
use crate::place::problem::Problem;

/// Largest part of a picture that is held at once, bytes.
const MOST_PART_BYTES: usize = 64 << 20;
/// Most parts, and most numbers of any list in the file.
const MOST_LIST_BYTES: usize = 16 << 20;

/// Keys of the GeoTIFF directory (OGC 19-008r4, annex on keys; from memory).
const MODEL_TYPE: u16 = 1024;
const RASTER_TYPE: u16 = 1025;
const GEOGRAPHIC_CODE: u16 = 2048;
const PROJECTED_CODE: u16 = 3072;
const PROJECTED_UNIT: u16 = 3076;
const VERTICAL_UNIT: u16 = 4099;
const MODEL_PROJECTED: u16 = 1;
const MODEL_GEOGRAPHIC: u16 = 2;
const PIXEL_IS_POINT: u16 = 2;
const UNIT_METRE: u16 = 9001;
const UNIT_FOOT: u16 = 9002;
const UNIT_US_FOOT: u16 = 9003;
/// "The file defines it itself": without a code.
const USER_DEFINED: u16 = 32_767;

/// A picture whose tags were read.
pub(super) struct TiffCells<'f> {
    file: &'f Path,
    decoder: Decoder<Cursor<&'f [u8]>>,
    columns: usize,
    no_data: Option<f64>,
}

/// Whether bytes begin like a TIFF of either byte order, classic or big.
pub(super) fn is_tiff(bytes: &[u8]) -> bool {
    [&b"II*\0"[..], b"MM\0*", b"II+\0", b"MM\0+"].iter().any(|start| bytes.starts_with(start))
}

/// Opens the picture and reads where it lies.
pub(super) fn open<'f>(
    files: &TerrainFiles<'f>,
) -> Result<(Geometry, Option<HeightUnit>, TiffCells<'f>), Box<Problem>> {
    let file = files.grid_file;
    let refuse = |message| Box::new(Problem::error(whole(file), message));
    let unreadable = |_| refuse("problem-tiff");
    let mut limits = Limits::default();
    limits.decoding_buffer_size = MOST_PART_BYTES;
    limits.intermediate_buffer_size = MOST_PART_BYTES;
    limits.ifd_value_size = MOST_LIST_BYTES;
    let decoder = Decoder::new(Cursor::new(files.grid)).map_err(unreadable)?;
    let mut decoder = decoder.with_limits(limits);
    let (columns, rows) = decoder.dimensions().map_err(unreadable)?;
    let (columns, rows) = (columns as usize, rows as usize);
    if columns > MOST_SIDE || rows > MOST_SIDE {
        let problem = Problem::error(whole(file), "problem-terrain-side").with("most", MOST_SIDE);
        return Err(Box::new(problem));
    }
    let samples = decoder.find_tag_unsigned::<u16>(Tag::SamplesPerPixel).map_err(unreadable)?.unwrap_or(1);
    if samples != 1 {
        return Err(Box::new(Problem::error(whole(file), "problem-tiff-bands").with("n", usize::from(samples))));
    }
    if decoder.find_tag(Tag::ModelTransformationTag).map_err(unreadable)?.is_some() {
        return Err(refuse("problem-tiff-turned"));
    }
    let numbers = |decoder: &mut Decoder<Cursor<&'f [u8]>>, tag| decoder.get_tag_f64_vec(tag).unwrap_or_default();
    let scale = numbers(&mut decoder, Tag::ModelPixelScaleTag);
    let tie = numbers(&mut decoder, Tag::ModelTiepointTag);
    let (&[step_x, step_y, ..], &[column, row, _, x, y, ..]) = (&scale[..], &tie[..]) else {
        return Err(refuse("problem-tiff-no-place"));
    };
    if tie.len() != 6 {
        return Err(refuse("problem-tiff-turned"));
    }
    let keys = GeoKeys(decoder.get_tag_u16_vec(Tag::GeoKeyDirectoryTag).unwrap_or_default());
    let coordinates = coordinates(files, &keys)?;
    let half = if keys.get(RASTER_TYPE) == Some(PIXEL_IS_POINT) { 0.5 } else { 0.0 };
    let geometry = Geometry {
        columns,
        rows,
        west: x - (column + half) * step_x,
        north: y + (row + half) * step_y,
        step_x,
        step_y,
        coordinates,
    };
    if !geometry.is_sound() {
        return Err(refuse("problem-terrain-place"));
    }
    let unit = match keys.get(VERTICAL_UNIT) {
        Some(UNIT_METRE) => Some(HeightUnit::Metres),
        Some(UNIT_FOOT | UNIT_US_FOOT) => Some(HeightUnit::Feet),
        _ => None,
    };
    let no_data = decoder.get_tag_ascii_string(Tag::GdalNodata).ok();
    let no_data = no_data.and_then(|text| text.trim_matches(['\0', ' ']).parse().ok());
    Ok((geometry, unit, TiffCells { file, decoder, columns, no_data }))
}

/// The directory of keys: four numbers a key, of which the last is the value where the second is 0.
struct GeoKeys(Vec<u16>);

impl GeoKeys {
    fn get(&self, wanted: u16) -> Option<u16> {
        self.0.chunks_exact(4).skip(1).find(|key| key[0] == wanted && key[1] == 0).map(|key| key[3])
    }
}

fn coordinates(files: &TerrainFiles<'_>, keys: &GeoKeys) -> Result<Coordinates, Box<Problem>> {
    let file = files.grid_file;
    let code = match keys.get(MODEL_TYPE) {
        Some(MODEL_PROJECTED) => keys.get(PROJECTED_CODE),
        Some(MODEL_GEOGRAPHIC) => keys.get(GEOGRAPHIC_CODE),
        _ => None,
    };
    let said = match code.filter(|code| *code != USER_DEFINED && *code != 0) {
        Some(code) => {
            let known = Coordinates::from_epsg(u32::from(code)).filter(|_| {
                keys.get(MODEL_TYPE) != Some(MODEL_PROJECTED)
                    || keys.get(PROJECTED_UNIT).is_none_or(|unit| unit == UNIT_METRE)
            });
            let told = || Problem::error(whole(file), "problem-terrain-code").with("text", format!("EPSG:{code}"));
            Some(known.ok_or_else(|| Box::new(told()))?)
        }
        None => None,
    };
    match (said, files.grid_coordinates) {
        (Some(said), Some(told)) if said != told => {
            let problem = Problem::error(whole(file), "problem-terrain-told-otherwise");
            Err(Box::new(problem.with("found", said.name()).with("told", told.name())))
        }
        (Some(said), _) => Ok(said),
        (None, Some(told)) => Ok(told),
        (None, None) => Err(Box::new(Problem::error(whole(file), "problem-tiff-no-code"))),
    }
}

impl CellSource for TiffCells<'_> {
    fn each_cell(&mut self, visit: &mut dyn FnMut(usize, usize, f64)) -> Result<(), Problem> {
        let broken = || Problem::error(whole(self.file), "problem-tiff");
        let (width, height) = self.decoder.chunk_dimensions();
        let (width, height) = (width as usize, height as usize);
        if width == 0 || height == 0 {
            return Err(broken());
        }
        let across = self.columns.div_ceil(width);
        let (_, rows) = self.decoder.dimensions().map_err(|_| broken())?;
        let chunks = across * (rows as usize).div_ceil(height);
        for chunk in 0..chunks {
            let index = u32::try_from(chunk).map_err(|_| broken())?;
            let (chunk_width, chunk_height) = self.decoder.chunk_data_dimensions(index);
            let part = self.decoder.read_chunk(index).map_err(|_| {
                Problem::error(whole(self.file), "problem-tiff-part").with("n", chunk + 1).with("of", chunks)
            })?;
            let heights = Heights(part);
            if heights.len() < chunk_width as usize * chunk_height as usize {
                return Err(broken());
            }
            let (first_row, first_column) = (chunk / across * height, chunk % across * width);
            for row in 0..chunk_height as usize {
                for column in 0..chunk_width as usize {
                    let value = heights.get(row * chunk_width as usize + column);
                    if value.is_finite() && self.no_data != Some(value) {
                        visit(first_row + row, first_column + column, value);
                    }
                }
            }
        }
        Ok(())
    }
}

/// The numbers of one part, whatever their type.
struct Heights(DecodingResult);

impl Heights {
    fn len(&self) -> usize {
        match &self.0 {
            DecodingResult::U8(values) => values.len(),
            DecodingResult::U16(values) => values.len(),
            DecodingResult::U32(values) => values.len(),
            DecodingResult::U64(values) => values.len(),
            DecodingResult::F16(values) => values.len(),
            DecodingResult::F32(values) => values.len(),
            DecodingResult::F64(values) => values.len(),
            DecodingResult::I8(values) => values.len(),
            DecodingResult::I16(values) => values.len(),
            DecodingResult::I32(values) => values.len(),
            DecodingResult::I64(values) => values.len(),
        }
    }

    /// A value; NaN beyond the last.
    fn get(&self, index: usize) -> f64 {
        let value = match &self.0 {
            DecodingResult::U8(values) => values.get(index).copied().map(f64::from),
            DecodingResult::U16(values) => values.get(index).copied().map(f64::from),
            DecodingResult::U32(values) => values.get(index).copied().map(f64::from),
            DecodingResult::U64(values) => values.get(index).map(|value| *value as f64),
            DecodingResult::F16(values) => values.get(index).map(|value| f64::from(value.to_f32())),
            DecodingResult::F32(values) => values.get(index).copied().map(f64::from),
            DecodingResult::F64(values) => values.get(index).copied(),
            DecodingResult::I8(values) => values.get(index).copied().map(f64::from),
            DecodingResult::I16(values) => values.get(index).copied().map(f64::from),
            DecodingResult::I32(values) => values.get(index).copied().map(f64::from),
            DecodingResult::I64(values) => values.get(index).map(|value| *value as f64),
        };
        value.unwrap_or(f64::NAN)
    }
}
