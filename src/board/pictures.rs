//! Frames written as PNG files, whole or not at all.

use std::io::{self, Write};
use std::path::{Path, PathBuf};

use embedded_graphics::pixelcolor::{Rgb565, RgbColor};

use super::size::FrameSize;

/// Red, green and blue of 8 bits; the highest bits fill the lowest, so that black stays black and white white.
pub(super) fn eight_bits(colour: Rgb565) -> [u8; 3] {
    let (red, green, blue) = (colour.r(), colour.g(), colour.b());
    [red << 3 | red >> 2, green << 2 | green >> 4, blue << 3 | blue >> 2]
}

/// The name of a picture: what it shows, in which language, how large.
pub fn file_name(view: &str, language: &str, size: FrameSize) -> String {
    format!("{view}-{language}-{size}.png")
}

/// Writes a frame as `name` into `folder` and gives its path. The folder is made where it is missing; a picture of that
/// name is replaced only when the new one is whole on the disk.
///
/// # Errors
/// What the system says where the folder cannot be made or written to; `InvalidInput` where `pixels` does not have as
/// many pixels as `size`. What was there before is as it was.
pub fn write(folder: &Path, name: &str, size: FrameSize, pixels: &[Rgb565]) -> io::Result<PathBuf> {
    if pixels.len() != size.pixels() || pixels.is_empty() {
        return Err(io::ErrorKind::InvalidInput.into());
    }
    std::fs::create_dir_all(folder)?;
    let path = folder.join(name);
    let mut builder = tempfile::Builder::new();
    builder.prefix(".deshielo-").suffix(".png");
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        // What any new file gets, less what the user's mask takes away.
        builder.permissions(std::fs::Permissions::from_mode(0o666));
    }
    let mut file = builder.tempfile_in(folder)?;
    file.write_all(&encode(size, pixels)?)?;
    file.as_file().sync_all()?;
    file.persist(&path).map_err(|error| error.error)?;
    // The name is on the disk only when the folder is; not every system can do that.
    let _ = std::fs::File::open(folder).and_then(|folder| folder.sync_all());
    Ok(path)
}

/// A frame as the bytes of a PNG file.
///
/// # Errors
/// What the encoder says, as where `pixels` does not have as many pixels as `size`.
pub fn encode(size: FrameSize, pixels: &[Rgb565]) -> io::Result<Vec<u8>> {
    let mut out = Vec::new();
    let mut encoder = png::Encoder::new(&mut out, size.width.into(), size.height.into());
    encoder.set_color(png::ColorType::Rgb);
    encoder.set_depth(png::BitDepth::Eight);
    let mut writer = encoder.write_header()?;
    let bytes: Vec<u8> = pixels.iter().flat_map(|&pixel| eight_bits(pixel)).collect();
    writer.write_image_data(&bytes)?;
    writer.finish()?;
    Ok(out)
}

#[cfg(test)]
mod tests {
    use super::*;
    use embedded_graphics::pixelcolor::RgbColor;

    const SIZE: FrameSize = FrameSize::new(3, 2);

    fn read(path: &Path) -> (u32, u32, Vec<u8>) {
        let file = io::BufReader::new(std::fs::File::open(path).unwrap());
        let mut reader = png::Decoder::new(file).read_info().unwrap();
        let mut bytes = vec![0; reader.output_buffer_size().unwrap()];
        let info = reader.next_frame(&mut bytes).unwrap();
        (info.width, info.height, bytes)
    }

    #[test]
    fn pictures_read_back_and_nothing_else_is_left() {
        let folder = tempfile::tempdir().unwrap();
        let into = folder.path().join("new/pictures");
        let name = file_name("valley", "es-CL", SIZE);
        assert_eq!(name, "valley-es-CL-3x2.png");
        let mut pixels = [Rgb565::WHITE; 6];
        pixels[1] = Rgb565::RED;
        write(&into, &name, SIZE, &[Rgb565::BLACK; 6]).unwrap();
        let path = write(&into, &name, SIZE, &pixels).unwrap();
        let (width, height, bytes) = read(&path);
        assert_eq!((width, height), (3, 2));
        assert_eq!(bytes[..9], [255, 255, 255, 255, 0, 0, 255, 255, 255]);
        assert_eq!(std::fs::read_dir(&into).unwrap().count(), 1);
    }

    #[test]
    fn what_cannot_be_written_leaves_what_was() {
        let folder = tempfile::tempdir().unwrap();
        let path = write(folder.path(), "a.png", SIZE, &[Rgb565::BLUE; 6]).unwrap();
        let before = std::fs::read(&path).unwrap();
        assert!(write(folder.path(), "a.png", SIZE, &[Rgb565::BLUE; 5]).is_err());
        assert!(write(&path, "a.png", SIZE, &[Rgb565::BLUE; 6]).is_err());
        assert_eq!(std::fs::read(&path).unwrap(), before);
        assert_eq!(std::fs::read_dir(folder.path()).unwrap().count(), 1);
    }
}
