#!/usr/bin/python3
"""Writes small files of twelve months that the readers of ice masks and sea temperatures are tested with.

Run it in this folder: it writes months-*.nc. Versions: ../README.md. The grid is that of make_netcdf.py. The mask of month
m (from 1) is 1 in cells c (row-major from the top) with c >= m; the temperature of month m in cell c is 270 + m + c/10 K.
Cell 29 has no value in either.
"""
import netCDF4
import numpy as np

ROWS, COLUMNS = 6, 5
X = (np.arange(COLUMNS) - 2) * 25e3
Y = (2.5 - np.arange(ROWS)) * 25e3
CELLS = np.arange(ROWS * COLUMNS).reshape(ROWS, COLUMNS)
MASK = np.array([np.where(CELLS == 29, 255, CELLS >= m) for m in range(1, 13)]).astype("u1")
KELVINS = np.array([np.where(CELLS == 29, np.nan, 270 + m + CELLS / 10) for m in range(1, 13)])


def start(path, y=Y, x=X):
    nc = netCDF4.Dataset(path, "w", format="NETCDF4")
    for name, values in (("y", y), ("x", x)):
        nc.createDimension(name, values.size)
        v = nc.createVariable(name, "f8", (name,))
        v.standard_name, v.units = f"projection_{name}_coordinate", "m"
        v[:] = values
    c = nc.createVariable("crs", "i4")
    c.grid_mapping_name = "polar_stereographic"
    c.latitude_of_projection_origin, c.straight_vertical_longitude_from_pole = 90.0, -45.0
    c.standard_parallel, c.false_easting, c.false_northing = 70.0, 0.0, 0.0
    c.semi_major_axis, c.semi_minor_axis = 6378273.0, 6356889.449
    return nc


def put(nc, name, kind, values, dims, fill=None, **attributes):
    v = nc.createVariable(name, kind, dims, fill_value=fill, zlib=True)
    v.set_auto_maskandscale(False)
    v.grid_mapping = "crs"
    v.setncatts(attributes)
    v[:] = values


def mask(path, values=MASK, numbers=None, name="ice_possible", x=X, kind="u1"):
    """Along a bare dimension, or one with numbers."""
    with start(path, x=x) as nc:
        nc.createDimension("month", values.shape[0])
        if numbers is not None:
            nc.createVariable("month", "i4", ("month",))[:] = numbers
        put(nc, name, kind, values, ("month", "y", "x"), fill=255)


def temperatures(path, values, units, time=None, turned=False, kind="f4"):
    """Along a climatology's time where one is given."""
    with start(path, y=Y[::-1] if turned else Y) as nc:
        nc.createDimension("time", values.shape[0])
        if time is not None:
            t = nc.createVariable("time", "f8", ("time",))
            t.standard_name, t.units, t[:] = "time", time[0], time[1]
        attributes = {} if units is None else {"units": units}
        put(nc, "sea_surface_temperature", kind, values[:, ::-1] if turned else values, ("time", "y", "x"), fill=-999.0, **attributes)


if __name__ == "__main__":
    middles = np.array([15, 45, 74, 105, 135, 166, 196, 227, 258, 288, 319, 349], "f8")
    mask("months-mask.nc", numbers=np.arange(1, 13))
    mask("months-bare.nc")
    mask("months-eleven.nc", values=MASK[:11])
    mask("months-one.nc", values=MASK[:1])
    mask("months-order.nc", numbers=[1, 2, 4, 3, 5, 6, 7, 8, 9, 10, 11, 12])
    mask("months-from-0.nc", numbers=np.arange(12))
    empty = MASK.copy()
    empty[6] = 255
    mask("months-empty.nc", values=empty)
    mask("months-two.nc", values=np.where(CELLS == 7, 2, MASK).astype("u1"))
    mask("months-name.nc", name="mask")
    mask("months-shifted.nc", x=X + 12.5e3)
    filled = np.where(np.isnan(KELVINS), -999.0, KELVINS)
    celsius = np.where(np.isnan(KELVINS), -999.0, KELVINS - 273.15)
    temperatures("months-kelvin.nc", filled, "K", time=("days since 1990-01-01", middles), turned=True)
    temperatures("months-celsius.nc", celsius, "degree_Celsius", time=("days since 0000-01-01", middles), kind="f8")
    temperatures("months-winter.nc", filled, "K", time=("days since 1990-07-01", middles))
    temperatures("months-no-units.nc", filled, None)
    temperatures("months-fahrenheit.nc", filled, "degF")
    temperatures("months-mislabelled.nc", celsius, "K")
