"""Writes land-sample.nc with netCDF-C (through netCDF4-python): a land file as other programs write one.

Usage, from this folder: /usr/bin/python3 make_land_sample.py
Three rows and four columns of 100 km around the south pole's grid corner, both axes turned round, 32-bit reals, one
cell without a value. Values count up in tenths along the rows of the grid as we order them, top row first.
"""
import netCDF4
import numpy

with netCDF4.Dataset("land-sample.nc", "w") as data:
    data.createDimension("y", 3)
    data.createDimension("x", 4)
    y = data.createVariable("y", "f8", ("y",))
    x = data.createVariable("x", "f8", ("x",))
    y[:] = 150000.0 + 100000.0 * numpy.arange(3)
    x[:] = 350000.0 - 100000.0 * numpy.arange(4)
    crs = data.createVariable("crs", "i4")
    crs.grid_mapping_name = "polar_stereographic"
    crs.latitude_of_projection_origin = -90.0
    crs.straight_vertical_longitude_from_pole = 360.0
    crs.standard_parallel = -70
    crs.semi_major_axis = 6378137.0
    crs.semi_minor_axis = 6356752.3
    land = data.createVariable("land_area_fraction", "f4", ("y", "x"), fill_value=-9.0, zlib=True)
    land.grid_mapping = "crs"
    values = numpy.arange(12).reshape(3, 4) / 16.0
    values[0, 1] = -9.0
    land[:] = values[::-1, ::-1]
