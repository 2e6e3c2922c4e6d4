"""Writes one FITS file with every layout, and prints what astropy reads from it, one line an item.

Lines: P hdu doubles | D hdu column row doubles | I, U hdu column row integers | S hdu column row strings | L, X hdu column row bits
       C hdu column row doubles in pairs | T hdu keyword text | R hdu keyword double | N hdu keyword integer
Doubles and strings are in hexadecimal.
"""
import struct
import sys
import warnings

import numpy as np
from astropy.io import fits

warnings.simplefilter("ignore")
path = sys.argv[1]
rng = np.random.default_rng(20)
units = [fits.PrimaryHDU(rng.integers(-30000, 30000, (3, 5)).astype("i2"))]
lines = []


def doubles(values):
    return " ".join(struct.pack(">d", float(v)).hex() for v in np.ravel(values))


def texts(values):
    return " ".join("x" + str(v).encode("latin1").hex() for v in values)


def pixels(data, blank=None):
    shown = np.array(data, dtype="f8")
    if blank is not None:
        shown[np.array(data) == blank] = np.nan
    lines.append(f"P {len(units) - 1} {doubles(shown)}")


pixels(units[0].data)

# Arrays of every element type, unsigned ones through BZERO.
for kind in ["u1", "i1", "i2", "u2", "i4", "u4", "i8", "u8"]:
    limits = np.iinfo(kind)
    data = np.concatenate([[limits.min, limits.max, 0, 1], rng.integers(limits.min, limits.max, 20, dtype=kind, endpoint=True)]).astype(kind)
    units.append(fits.ImageHDU(data.reshape(2, 3, 4)))
    lines.append(f"P {len(units) - 1} {doubles([float(int(v)) for v in data])}")
    lines.append(f"{'U' if kind[0] == 'u' else 'I'} {len(units) - 1} - 0 {' '.join(str(int(v)) for v in data)}")
for kind in ["f4", "f8"]:
    data = np.concatenate([[0, -0.0, np.nan, np.inf, -np.inf, 1e-40, 1e38], rng.normal(0, 1e5, 53)]).astype(kind)
    units.append(fits.ImageHDU(data))
    pixels(data)

# Scaled integers with a blank value: physical = zero + scale x stored.
for kind in ["u1", "i2", "i4", "i8"]:
    data = rng.integers(0, 100, 40).astype(kind)
    data[5] = 77
    unit = fits.ImageHDU(data)
    unit.header["BSCALE"], unit.header["BZERO"], unit.header["BLANK"] = 0.1, 5.25, 77
    units.append(unit)
    shown = 5.25 + 0.1 * data.astype("f8")
    shown[data == 77] = np.nan
    lines.append(f"P {len(units) - 1} {doubles(shown)}")

# A binary table of every type, alone, in vectors and empty.
ROWS = 4
columns = []


def add(name, form, array, code, **more):
    columns.append((fits.Column(name=name, format=form, array=array, **more), code, array, more))


for repeat in [1, 3]:
    shape = (ROWS, repeat) if repeat > 1 else (ROWS,)
    for form, kind in [("B", "u1"), ("I", "i2"), ("J", "i4"), ("K", "i8")]:
        limits = np.iinfo(kind)
        add(f"{form}{repeat}", f"{repeat}{form}", rng.integers(limits.min, limits.max, shape, dtype=kind), "I")
    for form, kind in [("I", "u2"), ("J", "u4"), ("K", "u8")]:
        limits = np.iinfo(kind)
        data = rng.integers(0, limits.max, shape, dtype=kind, endpoint=True)
        add(f"U{form}{repeat}", f"{repeat}{form}", data, "U", bzero=2 ** (limits.bits - 1))
    add(f"SB{repeat}", f"{repeat}B", rng.integers(0, 256, shape).astype("u1"), "G")
    for form, kind in [("E", "f4"), ("D", "f8")]:
        add(f"{form}{repeat}", f"{repeat}{form}", rng.normal(0, 1, shape).astype(kind), "D")
    for form, kind in [("C", "c8"), ("M", "c16")]:
        add(f"{form}{repeat}", f"{repeat}{form}", (rng.normal(0, 1, shape) + 1j * rng.normal(0, 1, shape)).astype(kind), "C")
    add(f"SC{repeat}", f"{repeat}C", (rng.normal(0, 1, shape) + 1j * rng.normal(0, 1, shape)).astype("c8"), "Y")
    add(f"L{repeat}", f"{repeat}L", rng.integers(0, 2, shape).astype(bool), "L")
    add(f"S{repeat}", f"{repeat}I", rng.integers(0, 9, shape).astype("i2"), "Z")
add("X11", "11X", rng.integers(0, 2, (ROWS, 11)).astype(bool), "X")
add("A9", "9A", np.array(["one", "", "it's  x", "ninechars"]), "S")
add("A3x2", "6A", np.array([["abc", "d"], ["", "ef"], ["g", ""], ["hij", "klm"]]), "S", dim="(3,2)")
add("MATRIX", "6E", rng.normal(0, 1, (ROWS, 2, 3)).astype("f4"), "D", dim="(3,2)")
add("EMPTY", "0D", np.zeros((ROWS, 0)), "D")
lengths = [3, 0, 5, 1]
for heap in ["P", "Q"]:
    for form, kind, code in [("B", "u1", "I"), ("I", "i2", "I"), ("J", "i4", "I"), ("K", "i8", "I"), ("E", "f4", "D"), ("D", "f8", "D")]:
        cells = np.empty(ROWS, dtype=object)
        for row, length in enumerate(lengths):
            cells[row] = rng.integers(0, 100, length).astype(kind)
        add(f"{heap}{form}", f"{heap}{form}()", cells, code)

table = fits.BinTableHDU.from_columns([column for column, *_ in columns], name="EVERYTHING")
units.append(table)
number = len(units) - 1
for index, (column, code, *_) in enumerate(columns, 1):
    if code == "Z":
        table.header[f"XSCAL{index}"], table.header[f"XZERO{index}"], table.header[f"XNULL{index}"] = 0.25, 1.5, 7
    if code == "Y":
        table.header[f"XSCAL{index}"], table.header[f"XZERO{index}"] = 0.25, 1.5
    if code == "G":
        table.header[f"XZERO{index}"] = -128
for column, code, array, more in columns:
    for row in range(ROWS):
        cell = np.ravel(array[row]) if not isinstance(array[row], str) else [array[row]]
        if code in "IU":
            lines.append(f"{code} {number} {column.name} {row} {' '.join(str(int(v)) for v in cell)}")
            lines.append(f"D {number} {column.name} {row} {doubles([float(int(v)) for v in cell])}")
        elif code == "G":
            lines.append(f"I {number} {column.name} {row} {' '.join(str(int(v) - 128) for v in cell)}")
        elif code == "Z":
            lines.append(f"D {number} {column.name} {row} {doubles(np.where(cell == 7, np.nan, 1.5 + 0.25 * cell))}")
        elif code == "D":
            lines.append(f"D {number} {column.name} {row} {doubles(cell)}")
        elif code == "C":
            lines.append(f"C {number} {column.name} {row} {doubles([part for v in cell for part in (v.real, v.imag)])}")
        elif code == "Y":
            parts = [part for v in cell for part in (1.5 + 0.25 * float(v.real), 0.25 * float(v.imag))]
            lines.append(f"C {number} {column.name} {row} {doubles(parts)}")
        elif code in "LX":
            lines.append(f"{code} {number} {column.name} {row} {' '.join(str(int(v)) for v in cell)}")
        elif code == "S":
            lines.append(f"S {number} {column.name} {row} {texts(cell)}")

# An ASCII table.
ascii_columns = [
    fits.Column(name="I", format="I10", array=np.array([1, -22, 333]), ascii=True),
    fits.Column(name="F", format="F12.4", array=np.array([1.5, -2.25, 1e6]), ascii=True),
    fits.Column(name="E", format="E20.10", array=np.array([1.5e-30, -2.25, 6.02e23]), ascii=True),
    fits.Column(name="D", format="D25.16", array=np.array([1 / 3, -1e-300, 1e300]), ascii=True),
    fits.Column(name="A", format="A8", array=np.array(["x", "", "eight ch"]), ascii=True),
]
units.append(fits.TableHDU.from_columns(ascii_columns, name="ASCII"))

# Header cards.
header = units[0].header
words = {
    "SHORT": "it's 'quoted'",
    "LONGTEXT": "a long text with 'quotes' and & signs " * 12,
    "HIERARCH ESO DET CHIP1 ID": "hierarch",
    "EMPTY": "",
}
for key, text in words.items():
    header[key] = (text, "a comment")
    # Expected is what was given: astropy 5.2 itself misreads doubled quotes at the start of a continued string.
    lines.append(f"T 0 {key.replace(' ', '_')} x{text.rstrip().encode().hex()}")
header["HIERARCH ESO a long keyword"] = 1.25
header["INTEGER"] = -123456789012
header["REAL"] = 1.2345678901234567e-123
fits.HDUList(units).writeto(path, overwrite=True)

with fits.open(path) as written:
    for key in ["REAL", "ESO a long keyword"]:
        lines.append(f"R 0 {key.replace(' ', '_')} {doubles([written[0].header[key]])}")
    lines.append(f"N 0 INTEGER {written[0].header['INTEGER']}")
    for row in range(3):
        for name in "IFED":
            lines.append(f"D {len(units) - 1} {name} {row} {doubles([written['ASCII'].data[name][row]])}")
        lines.append(f"S {len(units) - 1} A {row} {texts([written['ASCII'].data['A'][row]])}")

# Scaling of columns is put into the file as text: astropy will not write all of it.
with open(path, "rb") as source:
    content = source.read()
with open(path, "wb") as target:
    target.write(content.replace(b"XSCAL", b"TSCAL").replace(b"XZERO", b"TZERO").replace(b"XNULL", b"TNULL"))
print("\n".join(lines))
