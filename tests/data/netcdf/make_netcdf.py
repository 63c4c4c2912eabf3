#!/usr/bin/python3
"""Writes the small files that the readers are tested with, and what netCDF4-python reads from them.

Run it in this folder: it writes *.nc, *.h5, kelvins.csv, times.csv and chunks.csv. Versions: ../README.md.
Every plane has 6 rows and 5 columns of 25 km on EPSG:3411, x from -50 to 50 km, y from 62.5 to -62.5 km.
The stored number of cell c (row-major from the top) is STORED[c] or a simple function of it.
"""
import csv
import datetime as dt

import cftime
import h5py
import netCDF4
import numpy as np

ROWS, COLUMNS = 6, 5
X = (np.arange(COLUMNS) - 2) * 25e3
Y = (2.5 - np.arange(ROWS)) * 25e3
STORED = (1000 + 53 * np.arange(ROWS * COLUMNS)).reshape(ROWS, COLUMNS)  # 1000 to 2537
DAY = (dt.date(2020, 1, 31) - dt.date(1970, 1, 1)).days
readings = []


def start(path, y=Y, x=X, units="m", time=DAY, time_units="days since 1970-01-01", calendar="standard", crs=True, unlimited=True):
    nc = netCDF4.Dataset(path, "w", format="NETCDF4")
    if time is not None:
        times = np.atleast_1d(time)
        nc.createDimension("time", None if unlimited else times.size)
        t = nc.createVariable("time", "f8", ("time",), chunksizes=(times.size,) if unlimited else None)
        t.standard_name, t.units, t.calendar = "time", time_units, calendar
        t[:] = times
    for name, values in (("y", y), ("x", x)):
        nc.createDimension(name, values.size)
        v = nc.createVariable(name, "f8", (name,))
        v.standard_name, v.units = f"projection_{name}_coordinate", units
        v[:] = values / (1000.0 if units == "km" else 1.0)
    if crs:
        c = nc.createVariable("crs", "i4")
        c.grid_mapping_name = "polar_stereographic"
        c.latitude_of_projection_origin, c.straight_vertical_longitude_from_pole = 90.0, -45.0
        c.standard_parallel, c.false_easting, c.false_northing = 70.0, 0.0, 0.0
        c.semi_major_axis, c.semi_minor_axis = 6378273.0, 6356889.449
    return nc


def put(nc, name, kind, values, dims=("time", "y", "x"), fill=None, expect=True, text=(), **attributes):
    """Stores raw numbers; further keywords are attributes, except those of createVariable."""
    options = {k: attributes.pop(k) for k in ("zlib", "complevel", "shuffle", "fletcher32", "contiguous", "chunksizes", "endian") if k in attributes}
    v = nc.createVariable(name, kind, dims, fill_value=fill, **options)
    v.set_auto_maskandscale(False)
    v.grid_mapping = "crs"
    for key, value in attributes.items():
        v.setncattr(key, value)
    for key, value in text:
        v.setncattr_string(key, value)
    v[:] = values if values.ndim != 2 else values.reshape([1 if d in ("time", "band") else s for d, s in zip(dims, v.shape)])
    if expect:
        readings.append((nc.filepath(), name))
    return v


def packing():
    nc = start("packing.nc")
    put(nc, "tenths", "u2", STORED, fill=np.uint16(1053), scale_factor=np.float32(0.1), units="K")
    put(nc, "hundredths", "i2", STORED * 10 - 20000, fill=np.int16(-10000), scale_factor=0.01, add_offset=200.0)
    put(nc, "bytes", "i1", STORED // 20 - 90, fill=np.int8(-40), scale_factor=1.0, add_offset=220.0)
    # netCDF4-python scales this one in 8 bits, where 237 + 20 runs over: it is checked by hand.
    put(nc, "unsigned_bytes", "u1", STORED // 10, expect=False, fill=np.uint8(100), scale_factor=np.int16(1), add_offset=np.int32(20))
    put(nc, "wide", "i4", STORED * 1000, fill=np.int32(1053000), scale_factor=1e-4)
    put(nc, "unsigned_wide", "u4", STORED * 1000, fill=np.uint32(1000000), scale_factor=1e-4)
    put(nc, "widest", "i8", STORED * 100000, fill=np.int64(100000000), scale_factor=1e-6)
    real = STORED / 10.0
    real[0, 0], real[5, 4] = np.nan, -999.9
    put(nc, "reals", "f4", real.astype("f4"), fill=np.float32(-999.9))
    put(nc, "doubles", "f8", real, fill=-999.9)
    put(nc, "shifted_reals", "f4", STORED.astype("f4"), scale_factor=0.1, add_offset=np.float32(0.5))
    put(nc, "missing_value", "u2", STORED, missing_value=np.uint16(1106), scale_factor=0.1)
    put(nc, "missing_values", "u2", STORED, fill=np.uint16(1000), missing_value=np.array([1053, 1106, 2537], "u2"), scale_factor=0.1)
    put(nc, "valid_range", "u2", STORED, valid_range=np.array([1053, 2484], "u2"), scale_factor=0.1)
    put(nc, "valid_min_max", "i2", STORED, valid_min=np.int16(1053), valid_max=np.int16(2484), scale_factor=0.1)
    put(nc, "valid_kelvins", "i2", STORED, expect=False, valid_range=np.array([105.29, 248.41]), scale_factor=0.1)
    put(nc, "no_fill_value", "i2", np.where(STORED == 1053, -32767, STORED), scale_factor=0.1)
    # The same bits as unsigned numbers: -1 is 65535, the fill value; -30536 is 35000.
    hidden = np.where(STORED == 1000, -1, np.where(STORED == 1053, -30536, STORED)).astype("i2")
    put(nc, "unsigned_attribute", "i2", hidden, fill=np.int16(-1), _Unsigned="true", scale_factor=0.01)
    put(nc, "long_text", "u2", STORED, fill=np.uint16(1053), scale_factor=0.1, text=[("_Unsigned", "true"), ("coordinates", "time")])
    for i in range(8):  # More than eight attributes are stored in another structure of the file.
        nc["long_text"].setncattr(f"note_{i}", "x" * 40)
    # What must be refused.
    put(nc, "big_endian", "i2", STORED, expect=False, endian="big", scale_factor=0.1)
    put(nc, "no_scale", "u2", STORED, expect=False, scale_factor=0.0)
    put(nc, "word_scale", "u2", STORED, expect=False, scale_factor="0.1")
    put(nc, "two_scales", "u2", STORED, expect=False, scale_factor=np.array([0.1, 0.2]))
    put(nc, "word_fill", "u2", STORED, expect=False, missing_value="none")
    put(nc, "one_limit", "u2", STORED, expect=False, valid_range=np.uint16(1))
    letters = nc.createVariable("letters", "S1", ("y", "x"))
    letters[:] = np.full((ROWS, COLUMNS), b"a")
    words = nc.createVariable("words", str, ("y", "x"))
    words[:] = np.full((ROWS, COLUMNS), "a", dtype=object)
    nc.createVariable("column", "u2", ("time", "y"))[:] = STORED[None, :, 0]
    nc.createDimension("band", 2)
    nc.createVariable("two_bands", "u2", ("band", "y", "x"))[:] = np.stack([STORED, STORED])
    nc.createVariable("number", "u2")[...] = 7
    nc.close()


def storage():
    for unlimited in (False, True):
        path = f"storage-{'unlimited' if unlimited else 'fixed'}.nc"
        nc = start(path, time=[DAY, DAY + 1], unlimited=unlimited)
        two = np.stack([STORED, STORED + 7])
        common = dict(fill=np.uint16(1053), scale_factor=0.1)
        if not unlimited:
            put(nc, "contiguous", "u2", two, contiguous=True, **common)
        put(nc, "slices", "u2", two, chunksizes=(1, ROWS, COLUMNS), **common)
        put(nc, "both_days", "u2", two, chunksizes=(2, ROWS, COLUMNS), **common)
        put(nc, "small_chunks", "u2", two, chunksizes=(1, 2, 3), zlib=True, shuffle=True, **common)
        put(nc, "deflated", "u2", two, chunksizes=(1, ROWS, COLUMNS), zlib=True, complevel=4, shuffle=True, **common)
        put(nc, "unshuffled", "u2", two, chunksizes=(1, ROWS, COLUMNS), zlib=True, shuffle=False, **common)
        put(nc, "checked", "u2", two, chunksizes=(1, ROWS, COLUMNS), zlib=True, shuffle=True, fletcher32=True, **common)
        put(nc, "checked_wide", "f4", two.astype("f4") / 10, chunksizes=(1, ROWS, COLUMNS), zlib=True, shuffle=True, fletcher32=True)
        nc.createVariable("never_written", "u2", ("time", "y", "x"), fill_value=np.uint16(1053), zlib=True)
        late = nc.createVariable("first_day_only", "u2", ("time", "y", "x"), fill_value=np.uint16(1053))
        late[0] = STORED
        nc.close()


def axes():
    tenths = dict(fill=np.uint16(1053), scale_factor=0.1)
    nc = start("bottom-up.nc", y=Y[::-1])
    put(nc, "tb", "u2", STORED[::-1], **tenths)
    nc.close()
    nc = start("right-to-left.nc", y=Y[::-1], x=X[::-1])
    put(nc, "tb", "u2", STORED[::-1, ::-1], **tenths)
    put(nc, "tb_transposed", "u2", STORED[::-1, ::-1].T[None], dims=("time", "x", "y"), **tenths)
    nc.close()
    nc = start("kilometers.nc", units="km", crs=False)
    put(nc, "tb", "u2", STORED, **tenths)
    put(nc, "transposed", "u2", STORED.T[None], dims=("time", "x", "y"), **tenths)
    put(nc, "plane", "u2", STORED, dims=("y", "x"), **tenths)
    nc.createDimension("band", 1)
    put(nc, "banded", "u2", STORED, dims=("time", "band", "y", "x"), **tenths)
    put(nc, "last_time", "u2", STORED[:, :, None], dims=("y", "x", "time"), **tenths)
    nc.close()
    # Plain HDF5: no dimension scales, no coordinates; text of fixed length with its own padding.
    with h5py.File("plain-20200131.h5", "w") as h:
        d = h.create_dataset("swath/tb", data=STORED.astype("u2"))
        d.attrs["scale_factor"], d.attrs["_FillValue"] = 0.1, np.uint16(1053)
        h.create_dataset("lzf", data=np.full((ROWS, COLUMNS), 1000, "u2"), chunks=(ROWS, COLUMNS), compression="lzf")
        # What a filter cannot make smaller is stored as it is, with a mark that the filter was skipped.
        h.create_dataset("lzf_skipped", data=STORED.astype("u2"), chunks=(ROWS, COLUMNS), compression="lzf")
        h.create_dataset("transposed", data=STORED.T.astype("u2"))
        d = h.create_dataset("stack", data=np.stack([STORED, STORED + 7]).astype("u2"))
        d.attrs["scale_factor"] = np.float16(0.1)
        t = h.create_dataset("time", data=np.array([DAY, DAY + 1], "i4"))
        t.attrs["units"] = np.bytes_("days since 1970-01-01")


def grids():
    tenths = dict(fill=np.uint16(1053), scale_factor=0.1, expect=False)
    for name, options in (("shifted", dict(x=X + 12.5e3)), ("spacing", dict(x=X / 2)), ("degrees", dict(units="degrees"))):
        nc = start(f"grid-{name}.nc", **options)
        put(nc, "tb", "u2", STORED, **tenths)
        nc.close()
    nc = start("grid-map.nc")
    nc["crs"].standard_parallel = 60.0
    put(nc, "tb", "u2", STORED, **tenths)
    nc.close()
    nc = start("grid-size.nc", x=np.arange(4) * 25e3)
    put(nc, "tb", "u2", STORED[:, :4], **tenths)
    nc.close()


def days():
    tenths = dict(fill=np.uint16(1053), scale_factor=0.1)
    nc = start("three-days-19990101.nc", time=np.array([49.5, 24.0, 1e30]) + 12.0, time_units="hours since 2020-01-30 00:00:00")
    put(nc, "tb", "u2", np.stack([STORED, STORED + 7, STORED + 14]), expect=False, **tenths)
    nc.close()
    for name, options in (
        ("noleap", dict(calendar="noleap")),
        ("months", dict(time_units="months since 1970-01-01")),
        ("no-units", dict(time_units="")),
        ("no-date", dict(time=1e9)),
    ):
        nc = start(f"time-{name}.nc", **options)
        put(nc, "tb", "u2", STORED, expect=False, **tenths)
        nc.close()
    nc = start("bounds.nc", time=[DAY + 1, DAY + 2])
    nc["time"].bounds = "span"
    nc.createDimension("two", 2)
    nc.createVariable("span", "f8", ("time", "two"))[:] = [[DAY, DAY + 1], [DAY + 1, DAY + 2]]
    put(nc, "tb", "u2", np.stack([STORED, STORED + 7]), **tenths)
    nc.close()
    nc = start("scalar-time.nc", time=None)
    t = nc.createVariable("when", "i4")
    t.units, t[...] = "seconds since 2020-01-31 23:59:59 -01:00", 0
    put(nc, "tb", "u2", STORED, dims=("y", "x"), coordinates="when", **tenths)
    nc.close()
    nc = start("attribute-20200202.nc", time=None)
    nc.time_coverage_start = "2020-01-31T12:00:00Z"
    put(nc, "tb", "u2", STORED, dims=("y", "x"), **tenths)
    nc.close()
    nc = start("attribute-wrong-20200202.nc", time=None)
    nc.time_coverage_start = "yesterday"
    put(nc, "tb", "u2", STORED, dims=("y", "x"), expect=False, **tenths)
    nc.close()
    nc = start("name.nc", time=None)  # Copied under names with and without dates by the tests.
    nc.createDimension("time", 1)
    put(nc, "tb", "u2", STORED, expect=False, **tenths)
    nc.close()
    nc = start("no-coordinate.nc", time=None)
    nc.createDimension("time", 2)
    put(nc, "tb", "u2", np.stack([STORED, STORED]), expect=False, **tenths)
    nc.close()


def expected():
    """What netCDF4-python reads, turned to the grid's rows and columns; one line a cell."""
    with open("kelvins.csv", "w", newline="") as f:
        out = csv.writer(f, lineterminator="\n")
        out.writerow(["file", "variable", "step", "cell", "kelvins"])
        for path, name in readings:
            with netCDF4.Dataset(path) as nc:
                v = nc[name]
                values = np.ma.filled(np.ma.masked_invalid(v[...].astype("f8")), np.nan)
                dims = list(v.dimensions)
                values = np.transpose(values, [dims.index(d) for d in dims if d not in ("y", "x")] + [dims.index("y"), dims.index("x")])
                values = values.reshape(-1, ROWS, COLUMNS)
                values = values[:, np.argsort(-nc["y"][:]), :][:, :, np.argsort(nc["x"][:])]
                for step, plane in enumerate(values):
                    for cell, kelvins in enumerate(plane.ravel()):
                        out.writerow([path, name, step, cell, repr(float(kelvins))])


def times():
    """What cftime makes of units of time."""
    cases = [
        ("days since 1970-01-01", "standard", 18292.0), ("days since 1970-01-01", "proleptic_gregorian", -0.25),
        ("day since 1970-1-1", "gregorian", 18292.9999999), ("d since 2000-01-01 12:00", "standard", 0.5),
        ("hours since 1900-01-01 00:00:0.0", "standard", 1052592.0), ("hours since 1-1-1 00:00:00", "standard", 17701584.0),
        ("hours since 0001-01-01 00:00:00", "proleptic_gregorian", 17701536.0), ("hr since 1979-01-01T06:00:00Z", "standard", 17.99),
        ("minutes since 2020-01-31 00:00:00 +01:00", "standard", 59.0), ("minutes since 2020-01-31 00:00:00 +01:00", "standard", 60.0),
        ("seconds since 1981-01-01 00:00:00 UTC", "standard", 1233273599.0), ("seconds since 1970-01-01T00:00:00-0530", "standard", 66600.0),
        ("milliseconds since 1970-01-01", "standard", 1580428800000.0), ("microseconds since 2020-01-31", "standard", 86399000000.0),
        ("days since 1582-10-04", "standard", 1.0), ("days since 1582-10-04", "proleptic_gregorian", 11.0),
        ("days since 1858-11-17", "standard", 58879.0),
    ]
    with open("times.csv", "w", newline="") as f:
        out = csv.writer(f, lineterminator="\n")
        out.writerow(["units", "calendar", "value", "day"])
        for units, calendar, value in cases:
            moment = cftime.num2date(value, units, calendar)
            moment += dt.timedelta(microseconds=500000)  # To the nearest second, as a day may miss midnight by a little.
            out.writerow([units, calendar, repr(value), f"{moment.year:04d}-{moment.month:02d}-{moment.day:02d}"])


def chunks():
    """Where the first chunk of some variables lies, for tests that damage it."""
    with open("chunks.csv", "w", newline="") as f:
        out = csv.writer(f, lineterminator="\n")
        out.writerow(["file", "variable", "start", "bytes"])
        for name in ("deflated", "unshuffled", "checked", "checked_wide"):
            with h5py.File("storage-fixed.nc") as h:
                info = h[name].id.get_chunk_info(0)
                assert info.chunk_offset == (0, 0, 0)
                out.writerow(["storage-fixed.nc", name, info.byte_offset, info.size])


for make in (packing, storage, axes, grids, days, expected, times, chunks):
    make()
