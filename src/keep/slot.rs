//! One kept file with its last good copy: saved whole or not at all, opened whole or told as damaged.

use std::io;

use serde::Serialize;
use serde::de::DeserializeOwned;

use super::layer::FileLayer;
use super::seal::{Damage, MOST_BYTES, seal, unseal};

/// What was found at the start.
#[derive(Clone, Debug, PartialEq)]
pub struct Opened<T> {
    /// What was kept; `None` where nothing was, or nothing good.
    pub value: Option<T>,
    /// What is wrong with the file itself, where something is. It was set aside where that could be done.
    pub damage: Option<Damage>,
    /// What the system says where it could not be read at all.
    pub unreadable: Option<io::ErrorKind>,
}

/// A kept file.
#[derive(Clone, Debug)]
pub struct Slot {
    name: &'static str,
    serial: u64,
    /// Whether the file of that name is good and the newest, so that it may take the place of the last good copy.
    is_good: bool,
    /// The newest state, sealed, where it may be whole in the new copy alone.
    only_in_new: Option<Vec<u8>>,
    /// Length and sum of what is on the card, so that the same is not written twice.
    on_card: Option<(usize, u32)>,
}

impl Slot {
    /// The file of that name, not looked at yet.
    pub fn new(name: &'static str) -> Self {
        Self { name, serial: 0, is_good: false, only_in_new: None, on_card: None }
    }

    /// Reads what was kept, the newest whole copy first, and sets aside what is no good.
    pub fn open<T: DeserializeOwned>(&mut self, layer: &mut impl FileLayer) -> Opened<T> {
        let opened = self.look(layer);
        if opened.damage.is_some() || opened.unreadable.is_some() {
            // Where it cannot be set aside it is written over by the next save.
            let aside = format!("{}.damaged", self.name);
            let _ = layer.rename(self.name, &aside).and_then(|()| layer.sync_names());
        }
        opened
    }

    /// Reads what was kept and leaves everything as it is.
    pub fn look<T: DeserializeOwned>(&mut self, layer: &impl FileLayer) -> Opened<T> {
        let mut opened = Opened { value: None, damage: None, unreadable: None };
        *self = Self::new(self.name);
        for copy in [Copy::Itself, Copy::New, Copy::Last] {
            let bytes = match layer.read(&copy.name(self.name), MOST_BYTES) {
                Ok(Some(bytes)) => bytes,
                Ok(None) => continue,
                Err(error) if copy == Copy::Itself => {
                    opened.unreadable = Some(error.kind());
                    continue;
                }
                Err(_) => continue,
            };
            let read = unseal(&bytes).and_then(|(serial, body)| {
                let value: T = serde_json::from_str(body).map_err(|_| Damage::Content)?;
                Ok((serial, mark(body), value))
            });
            match read {
                Ok((serial, mark, value)) if serial > self.serial || opened.value.is_none() => {
                    self.is_good = copy == Copy::Itself;
                    self.on_card = self.is_good.then_some(mark);
                    self.only_in_new = (copy == Copy::New).then_some(bytes);
                    (self.serial, opened.value) = (serial, Some(value));
                }
                // A torn new copy is what a power cut leaves, and no damage to what was kept.
                Err(damage) if copy == Copy::Itself => opened.damage = Some(damage),
                _ => {}
            }
        }
        opened
    }

    /// Keeps a value. `Ok(false)`: it is what is on the card already.
    ///
    /// # Errors
    /// What the system says. What was kept before is still there, or this is.
    pub fn save<T: Serialize>(&mut self, value: &T, layer: &mut impl FileLayer) -> io::Result<bool> {
        let mut body = serde_json::to_string(value).map_err(io::Error::from)?;
        body.push('\n');
        if self.on_card == Some(mark(&body)) {
            return Ok(false);
        }
        let sealed = seal(self.serial.saturating_add(1), &body);
        if sealed.len() > MOST_BYTES {
            return Err(io::ErrorKind::FileTooLarge.into());
        }
        self.save_from_new(layer)?;
        let new = Copy::New.name(self.name);
        if let Err(error) = layer.write(&new, &sealed).and_then(|()| layer.sync(&new)) {
            // On a full card the torn copy only takes room.
            let _ = layer.remove(&new);
            return Err(error);
        }
        // From here on the copy is whole, and may be what the next start finds.
        self.serial = self.serial.saturating_add(1);
        self.on_card = None;
        self.only_in_new = Some(sealed);
        layer.sync_names()?;
        if std::mem::take(&mut self.is_good) {
            layer.rename(self.name, &Copy::Last.name(self.name))?;
            layer.sync_names()?;
        }
        layer.rename(&new, self.name)?;
        layer.sync_names()?;
        (self.is_good, self.only_in_new) = (true, None);
        self.on_card = Some(mark(&body));
        Ok(true)
    }

    /// The new copy is about to be written over: where it may be the only one of the newest state, the last good copy
    /// becomes that state first.
    fn save_from_new(&mut self, layer: &mut impl FileLayer) -> io::Result<()> {
        let Some(sealed) = &self.only_in_new else { return Ok(()) };
        let last = Copy::Last.name(self.name);
        // Its name must be on the card before another copy is touched.
        layer.sync_names()?;
        layer.write(&last, sealed)?;
        layer.sync(&last)?;
        layer.sync_names()?;
        self.only_in_new = None;
        Ok(())
    }
}

fn mark(body: &str) -> (usize, u32) {
    (body.len(), crc32fast::hash(body.as_bytes()))
}

#[derive(Clone, Copy, PartialEq, Eq)]
enum Copy {
    Itself,
    New,
    Last,
}

impl Copy {
    fn name(self, name: &str) -> String {
        match self {
            Copy::Itself => name.to_owned(),
            Copy::New => format!("{name}.new"),
            Copy::Last => format!("{name}.last"),
        }
    }
}
