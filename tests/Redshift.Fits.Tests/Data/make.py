"""Makes the small tile-compressed files in this folder with astropy: HDU 1 compressed, HDU 2 what astropy reads from it."""
import gzip
import io
import os
import warnings

import numpy as np
from astropy.io import fits

warnings.simplefilter("ignore")
FOLDER = os.path.dirname(os.path.abspath(__file__))
Y, X = np.mgrid[0:11, 0:14]
SMOOTH = 100 + 30 * np.sin(X / 3.0) * np.cos(Y / 4.0) + (X * 7 + Y * 13) % 5

CASES = {
    "rice-int16": (SMOOTH.astype("i2"), dict(compression_type="RICE_1")),
    "rice-byte": (SMOOTH.astype("u1"), dict(compression_type="RICE_1", tile_size=(5, 4))),
    "rice-int32": ((SMOOTH * 1e6).astype("i4"), dict(compression_type="RICE_1", tile_size=(14, 3))),
    "rice-float-dither1": (SMOOTH.astype("f4"), dict(compression_type="RICE_1", quantize_method=1, dither_seed=9999)),
    "rice-double-dither2": (np.where(X == Y, 0, SMOOTH), dict(compression_type="RICE_1", quantize_method=2, dither_seed=3)),
    "gzip-int32": (SMOOTH.astype("i4"), dict(compression_type="GZIP_1")),
    "gzip2-int16": (SMOOTH.astype("i2"), dict(compression_type="GZIP_2")),
    "gzip2-float-lossless": (SMOOTH.astype("f4"), dict(compression_type="GZIP_2", quantize_level=0)),
    "gzip-float-nan": (np.where(X == 3, np.nan, SMOOTH).astype("f4"), dict(compression_type="GZIP_1", quantize_method=-1)),
    "plio-int16": (((X * Y) % 7 // 5).astype("i2"), dict(compression_type="PLIO_1")),
    "hcompress-int16": (SMOOTH.astype("i2"), dict(compression_type="HCOMPRESS_1", tile_size=(14, 11), hcomp_scale=0)),
    "hcompress-smooth": (SMOOTH.astype("f4"), dict(compression_type="HCOMPRESS_1", tile_size=(14, 6), hcomp_scale=4, hcomp_smooth=1)),
}

for name, (data, settings) in CASES.items():
    packed = io.BytesIO()
    fits.HDUList([fits.PrimaryHDU(), fits.CompImageHDU(data, name="PACKED", **settings)]).writeto(packed)
    seen = fits.open(io.BytesIO(packed.getvalue()))[1].data
    expected = io.BytesIO()
    fits.HDUList([fits.PrimaryHDU(), fits.ImageHDU(seen, name="EXPECTED")]).writeto(expected)
    both = packed.getvalue() + expected.getvalue()[2880:]
    with open(os.path.join(FOLDER, name + ".fits.gz"), "wb") as target:
        target.write(gzip.compress(both, 9, mtime=0))
