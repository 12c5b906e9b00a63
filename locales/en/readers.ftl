# What can be wrong with files of exchange (WaterML 2.0, NetCDF), grids of heights and outlines. A message says what is
# wrong, its .remedy says what would be right.

## A first look

problem-peek-layout = This does not look like a table of days: no line has a date beside other cells.
    .remedy = A record has a header and one row for each day, with a comma, semicolon, tab or | between the cells.
problem-peek-header = The days start on the first line, without a header.
    .remedy = Write the names of the columns on a line above them.
problem-peek-date = No column of this file can be read as a date on every row.
    .remedy = Write the day of each row, with a year of four digits: 2004-05-31.
problem-peek-columns = No column of this file is one that a place can use.
    .remedy = Name the columns by what they measure: tmin, tmax, precipitation, flow, snow water, storage.

## Files of exchange

problem-exchange-two-byte = This text is stored with two bytes for each letter (UTF-16).
    .remedy = Save it as UTF-8.
problem-exchange-not-utf8 = There is a letter here that is not UTF-8.
    .remedy = Save the file as UTF-8.
problem-exchange-time = “{ $text }” is not the time of a measurement.
    .remedy = Times are written 2004-05-31 or 2004-05-31T00:00:00-06:00, from 1750 to 2200.
problem-exchange-value = “{ $text }” is not a number.
    .remedy = Write the number alone, or mark the value as missing the way the format does.
problem-exchange-day-twice = { $date } has more than one value.
    .remedy = Make days first: the mean of the day for flows, the sum for rain and snow.
problem-exchange-day-back = { $date } comes after a later day.
    .remedy = Sort the values from the first day to the last.
problem-exchange-empty = There is a series without any value.
    .remedy = Ask for the file again, with the years that you need.
problem-exchange-many = This file has more than { $most } series.
    .remedy = Ask for the series of your valley only.

## WaterML

problem-xml = This XML cannot be read from here on.
    .remedy = Ask for the file again. It may have been cut off or changed on its way.
problem-xml-cut = The file ends before “{ $text }” is closed.
    .remedy = Ask for the file again. It was cut off on its way.
problem-xml-deep = Too many elements lie inside each other here.
    .remedy = Ask for the file as WaterML 2.0.
problem-xml-entity = The short form “&{ $text };” is not read.
    .remedy = Write the letters themselves.
problem-waterml-old = This is WaterML 1, the older form.
    .remedy = Ask for WaterML 2.0, or for CSV.
problem-waterml-none = This XML has no series of measurements in WaterML 2.0.
    .remedy = Ask for the time series as WaterML 2.0, or for CSV.
problem-waterml-namespace = This series is not in the namespace of WaterML 2.0.
    .remedy = Ask for WaterML 2.0: http://www.opengis.net/waterml/2.0
problem-waterml-words = This series has words for values, not numbers.
    .remedy = Leave it out of the file.
problem-waterml-units = This value is in “{ $unit }”, and the ones before are in “{ $other }”.
    .remedy = Put series in different units into files of their own.

## NetCDF

problem-netcdf-hdf5 = This is NetCDF-4, which is built on HDF5.
    .remedy = Save it as NetCDF classic.
problem-netcdf-header = The head of this NetCDF file makes no sense at byte { $byte }.
    .remedy = Ask for the file again. NetCDF classic is read: versions 1, 2 and 5.
problem-netcdf-cut = The file has fewer bytes than it says. What is missing begins at byte { $byte }.
    .remedy = Ask for the file again. It was cut off on its way.
problem-netcdf-no-time = This file has no time axis.
    .remedy = A time axis has units such as “days since 1970-01-01”.
problem-netcdf-time-units = The time axis has the units “{ $text }”.
    .remedy = Days, hours, minutes or seconds since a day are read. Months and years differ in length.
problem-netcdf-calendar = The time axis follows the calendar “{ $text }”.
    .remedy = Only the calendar on the wall is read. Others have no 29 February, or 30 days in each month.
problem-netcdf-time = Step { $n } of the time axis, { $text }, is no day of a record.
    .remedy = Days from 1750 to 2200 are read. Check the units of the axis.
problem-netcdf-long = The time axis has more than { $most } steps.
    .remedy = Make days out of hours first, or ask for fewer years.
problem-netcdf-no-series = No number in this file has a value for each step of the time axis.
    .remedy = Ask for the series of one station.
problem-netcdf-stations = This file has { $n } stations or cells side by side.
    .remedy = Cut out the one of your valley.
problem-netcdf-ragged = In this file several stations lie behind each other on one axis.
    .remedy = Cut out the one of your valley.

## Heights and outlines

problem-outline-json = This GeoJSON cannot be read from here on.
    .remedy = Save the outline as GeoJSON again.
problem-outline-none = There is no polygon in this file.
    .remedy = Save the outline of the basin as a polygon.
problem-outline-several = This file has { $n } polygons. It is not clear which one is the basin.
    .remedy = Keep the one of your basin, or join them into one.
problem-outline-ring = A line around the basin is not whole.
    .remedy = It needs three corners at least, as numbers, and ends where it began.
problem-outline-not-degrees = The outline does not say its coordinates, and its numbers are not degrees.
    .remedy = Save it in degrees (EPSG:4326), or in the projection of the heights with its code in the file.
problem-outline-tangled = The outline crosses the rows of the grid too often to be a basin.
    .remedy = Make the outline simpler.
problem-terrain-coordinates = The heights ({ $file }) are in { $grid } and the outline is in { $outline }.
    .remedy = Save both in the same coordinates. Nothing is turned from one into the other here.
problem-terrain-code = The coordinates “{ $text }” are not known here to be in degrees or in meters.
    .remedy = Use degrees (EPSG:4326) or a UTM zone, for example EPSG:32613.
problem-terrain-told-otherwise = The file says that it is in { $found }. You say { $told }.
    .remedy = Leave --coordinates away, or give the file that you mean.
problem-terrain-no-prj = This grid does not say its coordinates.
    .remedy = Put its .prj file beside it, or say them: --coordinates EPSG:32613
problem-terrain-prj = The .prj file beside this grid names no coordinates that are known here.
    .remedy = Use degrees (EPSG:4326) or a UTM zone in meters. You can say them: --coordinates EPSG:32613
problem-terrain-place = This grid lies nowhere on Earth, or its cells have no size.
    .remedy = Check its corner, its cell size and its coordinates.
problem-terrain-large = This grid has more than { $most } million cells.
    .remedy = Cut out the part around the basin, or make the cells larger.
problem-terrain-side = This grid has a side of more than { $most } cells.
    .remedy = Cut out the part around the basin, or make the cells larger.
problem-terrain-beyond = The outline reaches { $text } cells beyond the grid.
    .remedy = Use a grid that holds the whole basin, in the same coordinates.
problem-terrain-nothing = No cell of the grid has its middle inside the outline.
    .remedy = Check that the two belong together, and that the cells are smaller than the basin.
problem-terrain-empty = { $percent }% of the basin has no height in the grid.
    .remedy = Use a grid without holes inside the basin.
problem-terrain-wild = { $n ->
        [one] { $n } cell of the basin has a height that is not on Earth.
       *[other] { $n } cells of the basin have a height that is not on Earth.
    }
    .remedy = Check the unit of the heights, and the mark for missing ones.
problem-terrain-flat = The whole basin lies within one meter of height.
    .remedy = Check that the grid has heights and not classes of land.
problem-grid-header = “{ $text }” is not a word of the head of an Esri ASCII grid.
    .remedy = The head has ncols, nrows, xllcorner, yllcorner, cellsize and NODATA_value, each with a number.
problem-grid-number = “{ $text }” is not a number.
    .remedy = Heights are written with a decimal point and a blank between them.
problem-grid-lacks = The head of this grid does not say “{ $key }”, or says a number that cannot be.
    .remedy = Save the grid again as Esri ASCII, or as GeoTIFF.
problem-grid-few = The grid ends too soon. Its head says { $wanted } heights.
    .remedy = Save the grid again. It was cut off.
problem-grid-many = The grid goes on after its { $wanted } heights.
    .remedy = Check ncols and nrows.
problem-tiff = This TIFF cannot be read.
    .remedy = Save it again as GeoTIFF: one band, uncompressed or with deflate or LZW.
problem-tiff-part = Part { $n } of { $of } of this TIFF cannot be read.
    .remedy = Save it again as GeoTIFF: one band, uncompressed or with deflate or LZW.
problem-tiff-bands = This TIFF has { $n } bands. Heights are one.
    .remedy = Save the band with the heights alone.
problem-tiff-turned = This grid is turned or bent against its coordinates.
    .remedy = Save it with north at the top.
problem-tiff-no-place = This TIFF does not say where it lies.
    .remedy = Save it as GeoTIFF.
problem-tiff-no-code = This TIFF does not say its coordinates by a code.
    .remedy = Save it with its EPSG code, or say it: --coordinates EPSG:32613
