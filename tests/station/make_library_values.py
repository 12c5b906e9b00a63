"""Writes library_values.csv: what the Python library pyet makes of every 30th day of seattle-weather.csv.

Run in this folder with pyet 1.5.0 (and the pandas it brings). Nothing here is our arithmetic except the sunshine that
pyet is given: FAO-56 eq. 50 with 0.16, from pyet's own extraterrestrial radiation.
"""
import numpy as np
import pandas as pd
import pyet
from pyet.meteo_utils import calc_e0, extraterrestrial_r

LATITUDE_DEG, ELEVATION_M = 47.45, 100.0
record = pd.read_csv("seattle-weather.csv", index_col="date", parse_dates=True)
tmin, tmax, wind = record.temp_min, record.temp_max, record.wind
middle, latitude = (tmax + tmin) / 2, np.radians(LATITUDE_DEG)
solar = 0.16 * np.sqrt(tmax - tmin) * extraterrestrial_r(record.index, latitude)
values = pd.DataFrame({
    "day_of_year": record.index.dayofyear,
    "tmin_c": tmin,
    "tmax_c": tmax,
    "wind_ms": wind,
    "hargreaves_mm": pyet.hargreaves(middle, tmax, tmin, latitude),
    "oudin_mm": pyet.oudin(middle, latitude),
    "penman_monteith_mm": pyet.pm_fao56(middle, wind, rs=solar, tmax=tmax, tmin=tmin, ea=calc_e0(tmin),
                                        elevation=ELEVATION_M, lat=latitude),
})
# pyet keeps the ratio of sunshine to clear sky above 0.3, which FAO-56 does not: days that this touches are left out.
values = values[tmax - tmin >= 2.1]
values.iloc[::30].to_csv("library_values.csv", float_format="%.13g")
