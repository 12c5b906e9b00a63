"""Makes the files of this folder with libraries that are not ours, and the values that they give.

Made once with scipy 1.17.1, numpy 2.4.6 and tifffile 2026.3.3. Everything in them is invented.
"""
import json
import numpy as np
import tifffile
from scipy.io import netcdf_file

out = "tests/place_readers/files/"
days = 400
index = np.arange(days)


def series(path, version, packed):
    with netcdf_file(path, "w", version=version) as net:
        net.Conventions = b"CF-1.8"
        net.featureType = b"timeSeries"
        net.createDimension("time", None)
        net.createDimension("station", 1)
        net.createDimension("ends", 2)
        time = net.createVariable("time", "f8", ("time",))
        time.units = b"hours since 1999-12-31 00:00:00"
        time.calendar = b"standard"
        time.bounds = b"time_bnds"
        ends = net.createVariable("time_bnds", "f8", ("time", "ends"))
        tmin = net.createVariable("tasmin", "i2" if packed else "f4", ("time", "station"))
        tmin.standard_name = b"air_temperature"
        tmin.cell_methods = b"time: minimum"
        tmin.units = b"K"
        if packed:
            tmin.scale_factor = 0.01
            tmin.add_offset = 273.15
            tmin._FillValue = np.int16(-32768)
        rain = net.createVariable("pr", "f4", ("time", "station"))
        rain.standard_name = b"precipitation_flux"
        rain.units = b"kg m-2 s-1"
        # The stamp is the end of each day; only the ends of the step say which day it is.
        time[:] = 24.0 * (index + 2)
        ends[:, 0] = 24.0 * (index + 1)
        ends[:, 1] = 24.0 * (index + 2)
        celsius = 5.0 * np.sin(index / 58.0)
        if packed:
            raw = np.round(celsius / 0.01).astype("i2")
            raw[7] = -32768
            tmin[:, 0] = raw
        else:
            tmin[:, 0] = celsius + 273.15
        rain[:, 0] = np.where(index % 5 == 0, 4.32 / 86400.0, 0.0)


series(out + "station.nc", 1, False)
series(out + "station64.nc", 2, True)

# A tilted plane with a ridge, 90 m cells, UTM zone 19 south; a triangle of a basin inside it.
rows, columns, step, west, north = 80, 60, 90.0, 350000.0, 6300000.0
y, x = np.mgrid[0:rows, 0:columns]
height = (1500.0 + 12.0 * y + 300.0 * np.exp(-((x - 30.0) / 8.0) ** 2)).astype("f4")
height[0, 0] = -9999.0
keys = [1, 1, 0, 4, 1024, 0, 1, 1, 1025, 0, 1, 1, 3072, 0, 1, 32719, 4099, 0, 1, 9001]
tifffile.imwrite(
    out + "heights.tif", height, compression="deflate", rowsperstrip=16, photometric="minisblack", metadata=None,
    extratags=[
        (33550, "d", 3, (step, step, 0.0)),
        (33922, "d", 6, (0.0, 0.0, 0.0, west, north, 0.0)),
        (34735, "H", len(keys), keys),
        (42113, "s", 0, "-9999"),
    ],
)
ring = [[351000.0, 6293200.0], [354900.0, 6294000.0], [352500.0, 6299000.0], [351000.0, 6293200.0]]
outline = {
    "type": "FeatureCollection",
    "crs": {"type": "name", "properties": {"name": "urn:ogc:def:crs:EPSG::32719"}},
    "features": [{"type": "Feature", "properties": {}, "geometry": {"type": "Polygon", "coordinates": [ring]}}],
}
json.dump(outline, open(out + "basin.geojson", "w"))
with open(out + "heights.asc", "w") as grid:
    grid.write(f"ncols {columns}\nnrows {rows}\nxllcorner {west}\nyllcorner {north - rows * step}\ncellsize {step}\n")
    grid.write("NODATA_value -9999\n")
    for line in height:
        grid.write(" ".join(f"{value:.3f}" for value in line) + "\n")

# Which cells have their middle inside, by the crossing rule written out anew.
cx, cy = west + (x + 0.5) * step, north - (y + 0.5) * step
inside = np.zeros(cx.shape, bool)
for (x0, y0), (x1, y1) in zip(ring[:-1], ring[1:]):
    between = (y0 > cy) != (y1 > cy)
    inside ^= between & (cx < x0 + (cy - y0) / (y1 - y0) * (x1 - x0))
values = {
    "area_km2": float(inside.sum() * step * step / 1e6),
    "mean_m": float(height[inside].astype("f8").mean()),
    "below_2000_km2": float((inside & (height < 2000.0)).sum() * step * step / 1e6),
    "lowest_m": float(height[inside].min()),
    "highest_m": float(height[inside].max()),
    "cells": int(inside.sum()),
}
json.dump(values, open(out + "heights_values.json", "w"), indent=1)
