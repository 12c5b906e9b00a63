//! Opens a bundle into a folder: all of it, or nothing.

use std::fs::{self, File};
use std::io::{self, Read, Seek, SeekFrom, Write};
use std::path::{Path, PathBuf};

use sha2::{Digest, Sha256};
use zip::ZipArchive;
use zip::read::{ArchiveOffset, Config};

use super::sums::{Entries, Entry, MOST_LIST_BYTES, read};
use super::{Fault, MOST_FILE_BYTES, MOST_MEMBERS, MemberName, SUMS};

/// What ends every zip archive without a remark, and how long it is (PKWARE, APPNOTE.TXT 6.3, section 4.3.16).
const END_MARK: &[u8] = b"PK\x05\x06";
const END_BYTES: u64 = 22;
/// How much is unpacked at a time.
const PIECE_BYTES: usize = 64 * 1024;

type Archive<'a> = ZipArchive<&'a mut File>;

/// Opens the bundle `file` into the folder `into`, which must not be there or be empty, and says what was in it.
///
/// # Errors
/// What is wrong with the bundle, or what the system says; `into` is as it was then.
pub fn unpack(file: &Path, into: &Path) -> Result<Vec<MemberName>, Fault> {
    refuse_occupied(into)?;
    let mut opened = open_file(file)?;
    let mut archive = open_archive(file, &mut opened)?;
    let entries = list(&mut archive)?;
    let parent = into.parent().filter(|parent| !parent.as_os_str().is_empty()).unwrap_or(Path::new("."));
    fs::create_dir_all(parent).map_err(Fault::system(parent))?;
    // Whatever goes wrong from here on, this folder goes with it.
    let new = tempfile::Builder::new().prefix(".deshielo-").tempdir_in(parent).map_err(Fault::system(parent))?;
    let mut folders = vec![new.path().to_owned()];
    for (name, entry) in &entries {
        let path = new.path().join(name.as_str());
        let folder = path.parent().unwrap_or(new.path());
        fs::create_dir_all(folder).map_err(Fault::system(folder))?;
        folders.push(folder.to_owned());
        member(&mut archive, name, entry, &path)?;
    }
    open_to_all(new.path())?;
    folders.sort();
    folders.dedup();
    folders.iter().rev().try_for_each(|folder| sync_folder(folder)).map_err(Fault::system(into))?;
    fs::rename(new.path(), into).map_err(|error| match error.kind() {
        io::ErrorKind::DirectoryNotEmpty | io::ErrorKind::AlreadyExists => Fault::Occupied(into.to_owned()),
        _ => Fault::system(into)(error),
    })?;
    // It has another name now, and there is nothing to clear away.
    let _ = new.keep();
    sync_folder(parent).map_err(Fault::system(parent))?;
    Ok(entries.into_keys().collect())
}

fn refuse_occupied(into: &Path) -> Result<(), Fault> {
    match fs::symlink_metadata(into) {
        Ok(about) if about.is_dir() => {
            let mut entries = fs::read_dir(into).map_err(Fault::system(into))?;
            if entries.next().is_some() { Err(Fault::Occupied(into.to_owned())) } else { Ok(()) }
        }
        Ok(_) => Err(Fault::Occupied(into.to_owned())),
        Err(error) if error.kind() == io::ErrorKind::NotFound => Ok(()),
        Err(error) => Err(Fault::system(into)(error)),
    }
}

/// Opens a regular file of a size that a bundle can have; a pipe that never ends is none.
fn open_file(path: &Path) -> Result<File, Fault> {
    let system = Fault::system(path);
    let shown = || path.display().to_string();
    if !fs::metadata(path).map_err(&system)?.is_file() {
        return Err(Fault::NotAFile(shown()));
    }
    let file = File::open(path).map_err(&system)?;
    if file.metadata().map_err(&system)?.len() > MOST_FILE_BYTES { Err(Fault::TooLarge(shown())) } else { Ok(file) }
}

/// Reads the directory of the archive. Its end is looked at first: how many members it announces decides how much memory
/// reading it takes, and it must be the only end that there could be.
fn open_archive<'a>(path: &Path, file: &'a mut File) -> Result<Archive<'a>, Fault> {
    let system = Fault::system(path);
    let length = file.metadata().map_err(&system)?.len();
    let mut end = [0; END_BYTES as usize];
    let start = length.checked_sub(END_BYTES).ok_or(Fault::NotABundle)?;
    file.seek(SeekFrom::Start(start)).and_then(|_| file.read_exact(&mut end)).map_err(&system)?;
    let count = |at: usize| usize::from(u16::from_le_bytes([end[at], end[at + 1]]));
    let long = |at: usize| u64::from(u32::from_le_bytes([end[at], end[at + 1], end[at + 2], end[at + 3]]));
    // Its directory lies just before its end, so that no other one can be taken for it.
    if !end.starts_with(END_MARK) || count(20) != 0 || long(12) + long(16) != start {
        return Err(Fault::NotABundle);
    }
    if count(8) > MOST_MEMBERS + 1 || count(10) > MOST_MEMBERS + 1 {
        return Err(Fault::TooMany);
    }
    let config = Config { archive_offset: ArchiveOffset::Known(0) };
    let mut archive = ZipArchive::with_config(config, file).map_err(|_| Fault::NotABundle)?;
    if archive.len() != count(10) || archive.has_duplicate_names() {
        return Err(Fault::NotABundle);
    }
    archive.validate_header_consistency().map_err(|_| Fault::NotABundle)?;
    Ok(archive)
}

/// The list of sums, held against the members that are there.
fn list(archive: &mut Archive<'_>) -> Result<Entries, Fault> {
    let mut text = String::new();
    let sums = archive.by_name(SUMS).map_err(|_| Fault::NotABundle)?;
    if !sums.is_file() || sums.is_symlink() || sums.encrypted() {
        return Err(Fault::NotABundle);
    }
    sums.take(MOST_LIST_BYTES + 1).read_to_string(&mut text).map_err(|_| Fault::NotABundle)?;
    if text.len() as u64 > MOST_LIST_BYTES {
        return Err(Fault::TooLarge(SUMS.to_owned()));
    }
    let entries = read(&text)?;
    for index in 0..archive.len() {
        let member = archive.by_index_raw(index).map_err(|_| Fault::NotABundle)?;
        let shown = String::from_utf8_lossy(member.name_raw()).into_owned();
        if shown == SUMS {
            continue;
        }
        let name = MemberName::new(&shown)?;
        // What is not a plain file by its mode is a link, a device or a folder.
        let kind = member.unix_mode().map_or(0, |mode| mode & 0o170_000);
        if member.is_symlink() || member.is_dir() || member.encrypted() || ![0, 0o100_000].contains(&kind) {
            return Err(Fault::NotAFile(shown));
        }
        let Some(entry) = entries.get(&name) else { return Err(Fault::Unlisted(shown)) };
        if member.size() != entry.length {
            return Err(Fault::Sum(shown));
        }
    }
    match entries.keys().find(|name| archive.index_for_name(name.as_str()).is_none()) {
        Some(missing) => Err(Fault::Missing(missing.as_str().to_owned())),
        None if !entries.keys().any(|name| name.as_str() == "place/place.toml") => Err(Fault::NoPlace),
        None => Ok(entries),
    }
}

/// Unpacks one member, never a byte more than its list says.
fn member(archive: &mut Archive<'_>, name: &MemberName, entry: &Entry, path: &Path) -> Result<(), Fault> {
    let wrong = || Fault::Sum(name.as_str().to_owned());
    let system = Fault::system(path);
    let mut packed = archive.by_name(name.as_str()).map_err(|_| wrong())?.take(entry.length + 1);
    let mut file = File::options().write(true).create_new(true).open(path).map_err(&system)?;
    let (mut hash, mut length) = (Sha256::new(), 0_u64);
    let mut piece = vec![0; PIECE_BYTES];
    loop {
        let got = packed.read(&mut piece).map_err(|_| wrong())?;
        if got == 0 {
            break;
        }
        length += got as u64;
        if length > entry.length {
            return Err(wrong());
        }
        hash.update(&piece[..got]);
        file.write_all(&piece[..got]).map_err(&system)?;
    }
    let sum: [u8; 32] = hash.finalize().into();
    if length != entry.length || sum != entry.sum {
        return Err(wrong());
    }
    file.sync_all().map_err(&system)
}

/// A temporary folder is closed to everybody else; what comes out of a bundle is for whoever runs the instrument.
fn open_to_all(folder: &Path) -> Result<(), Fault> {
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        fs::set_permissions(folder, fs::Permissions::from_mode(0o755)).map_err(Fault::system(folder))?;
    }
    let _ = folder;
    Ok(())
}

/// Brings the names in a folder to the card, where folders can be opened as files.
fn sync_folder(folder: &Path) -> io::Result<()> {
    if cfg!(unix) { File::open(PathBuf::from(folder))?.sync_all() } else { Ok(()) }
}
