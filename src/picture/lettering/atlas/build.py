#!/usr/bin/env python3
"""Rasterises the two B612 faces into `letters.bin`, the file that the program carries.

Needs Python 3.9 or later, freetype-py 2.5.1 (its wheel carries FreeType 2.13.2) and fonttools 4.68.0:

    python3 build.py FOLDER     FOLDER holds B612-Regular.otf and B612-Bold.otf, version 1.008
    python3 build.py FOLDER --check     compares with the committed file, writes nothing

README.md beside this file describes the format and the marks that are drawn here instead of by the face.
"""

import ctypes
import hashlib
import pathlib
import struct
import sys

import freetype
from fontTools.ttLib import TTFont

SOURCES = {
    "B612-Regular.otf": "df7f7328313c175ded19104d507aab6a51908a18507c38b4fb0c989ede9845fc",
    "B612-Bold.otf": "527ddd0597d234e2d4ed7115f370bab6c3857172980127da464147010575ee23",
}
SIZES_PX = (9, 10, 11, 12, 13, 15, 18, 22, 28, 36, 48, 64, 80)
# Up to this size letters are kept at four quarter-pixel places, so that their spacing stays even.
LARGEST_WITH_PHASES_PX = 22
PHASES = 4
CHARACTERS = sorted(
    [chr(code) for code in range(0x20, 0x7F)]
    + list("áéíóúñüÁÉÍÓÚÑÜ¿¡«»°²³·–—−×÷→←↑↓½¼¾…‘’“”‰±≥≤•")
    + ["\u00a0", "\u2009", "\u202f"]
)
FIGURES = "0123456789"
# The face's own raised figures are three pixels wide in small type; m³ has to be read from the back row.
RAISED = {"²": "2", "³": "3"}
RAISED_SHARE = 0.68
RAISED_TOP = 1600
# Width of the two thin spaces, of 2000 to the em: about two pixels in 13 px type.
THIN_SPACE = 330


class Source:
    """One weight: its outlines, its metrics and its kerning, in units of 2000 to the em."""

    def __init__(self, path):
        found = hashlib.sha256(path.read_bytes()).hexdigest()
        if found != SOURCES[path.name]:
            sys.exit(f"{path}: SHA-256 is {found}, not that of B612 version 1.008")
        self.face = freetype.Face(str(path))
        self.table = TTFont(path)
        self.units = self.table["head"].unitsPerEm
        self.map = self.table.getBestCmap()

    def advance(self, character):
        if character in ("\u2009", "\u202f"):
            return THIN_SPACE
        if character in RAISED:
            return round(self.advance(RAISED[character]) * RAISED_SHARE)
        return self.table["hmtx"][self.map[ord(character)]][0]

    def kerning(self):
        """Pairs of positions in CHARACTERS with a horizontal correction, first matching subtable wins."""
        names = {self.map[ord(c)]: i for i, c in enumerate(CHARACTERS) if ord(c) in self.map and c not in RAISED}
        pairs = {}
        gpos = self.table["GPOS"].table
        lookups = {i for f in gpos.FeatureList.FeatureRecord if f.FeatureTag == "kern" for i in f.Feature.LookupListIndex}
        for left, i in names.items():
            for right, j in names.items():
                value = next(filter(None, (pair_value(gpos.LookupList.Lookup[k], left, right) for k in lookups)), 0)
                # Figures keep their column, whatever stands beside them.
                if value and CHARACTERS[i] not in FIGURES and CHARACTERS[j] not in FIGURES:
                    pairs[(i, j)] = value
        return sorted(pairs.items())

    def render(self, character, px, phase):
        """Coverage rows and the offset of the left top corner from the pen, y upwards."""
        raise_by = 0
        if character in RAISED:
            character = RAISED[character]
            small = max(6, round(px * RAISED_SHARE))
            raise_by = round(RAISED_TOP * px / self.units) - round(1500 * small / self.units)
            px = small
        self.face.set_pixel_sizes(0, px)
        flags = freetype.FT_LOAD_TARGET_LIGHT | freetype.FT_LOAD_NO_AUTOHINT | freetype.FT_LOAD_NO_BITMAP
        self.face.load_glyph(self.face.get_char_index(character), flags)
        slot = self.face.glyph
        freetype.FT_Outline_Translate(ctypes.byref(slot.outline._FT_Outline), phase * 64 // PHASES, 0)
        slot.render(freetype.FT_RENDER_MODE_NORMAL)
        bitmap = slot.bitmap
        rows = [
            [min(15, (v * 15 + 127) // 255) for v in bitmap.buffer[r * bitmap.pitch : r * bitmap.pitch + bitmap.width]]
            for r in range(bitmap.rows)
        ]
        left, top = slot.bitmap_left, slot.bitmap_top + raise_by
        while rows and not any(rows[0]):
            rows, top = rows[1:], top - 1
        while rows and not any(rows[-1]):
            rows = rows[:-1]
        while rows and not any(row[0] for row in rows):
            rows, left = [row[1:] for row in rows], left + 1
        while rows and not any(row[-1] for row in rows):
            rows = [row[:-1] for row in rows]
        return rows, left, top


def pair_value(lookup, left, right):
    for table in lookup.SubTable:
        if left not in table.Coverage.glyphs:
            continue
        if table.Format == 1:
            for record in table.PairSet[table.Coverage.glyphs.index(left)].PairValueRecord:
                if record.SecondGlyph == right:
                    return (record.Value1.XAdvance or 0) if record.Value1 else 0
        else:
            record = table.Class1Record[table.ClassDef1.classDefs.get(left, 0)]
            value = record.Class2Record[table.ClassDef2.classDefs.get(right, 0)].Value1
            if value and getattr(value, "XAdvance", 0):
                return value.XAdvance
    return 0


def runs(values):
    """A byte per run: length less one in the upper four bits, coverage in the lower four."""
    out, at = bytearray(), 0
    while at < len(values):
        length = 1
        while length < 16 and at + length < len(values) and values[at + length] == values[at]:
            length += 1
        out.append((length - 1) << 4 | values[at])
        at += length
    return bytes(out)


def nibbles(values):
    padded = values + [0] * (len(values) % 2)
    return bytes(a << 4 | b for a, b in zip(padded[::2], padded[1::2]))


def build(folder):
    weights = [Source(folder / name) for name in SOURCES]
    phases = [PHASES if px <= LARGEST_WITH_PHASES_PX else 1 for px in SIZES_PX]
    data, seen, glyphs = bytearray(), {}, bytearray()
    for weight in weights:
        for px, count in zip(SIZES_PX, phases):
            for character in CHARACTERS:
                for phase in range(count):
                    blank = character in " \u00a0\u2009\u202f"
                    rows, left, top = ([], 0, 0) if blank else weight.render(character, px, phase)
                    flat = [v for row in rows for v in row]
                    packed = min((1, runs(flat)), (0, nibbles(flat)), key=lambda p: (len(p[1]), p[0]))
                    at = seen.get(packed[1])
                    if at is None:
                        at = seen[packed[1]] = len(data)
                        data += packed[1]
                    width = len(rows[0]) if rows else 0
                    glyphs += struct.pack("<IbbBB", at << 1 | packed[0], left, top, width, len(rows))
    kerning = [weight.kerning() for weight in weights]
    out = bytearray(b"LTR1")
    out += struct.pack("<BBHHHI", len(SIZES_PX), PHASES, len(CHARACTERS), *(len(k) for k in kerning), len(glyphs))
    out += bytes(SIZES_PX) + bytes(phases)
    out += b"".join(struct.pack("<H", ord(c)) for c in CHARACTERS)
    for weight in weights:
        out += b"".join(struct.pack("<H", weight.advance(c)) for c in CHARACTERS)
    for pairs in kerning:
        out += b"".join(struct.pack("<BBh", i, j, value) for (i, j), value in pairs)
    return bytes(out + glyphs + data)


def main():
    if len(sys.argv) < 2:
        sys.exit(__doc__)
    made = build(pathlib.Path(sys.argv[1]))
    target = pathlib.Path(__file__).with_name("letters.bin")
    if "--check" in sys.argv[2:]:
        same = target.read_bytes() == made
        print("same bytes" if same else "the bytes differ")
        sys.exit(0 if same else 1)
    target.write_bytes(made)
    print(f"{target.name}: {len(made)} bytes")


if __name__ == "__main__":
    main()
