"""Estimates land shares of coastal cells by counting points, with PROJ (through pyproj) and Matplotlib.

Usage: /usr/bin/python3 make_land_references.py LAND_50M_JSON BINNED_GSHHS_I_NC
The two files are those that scripts/build-land.sh takes. Writes land-shares.csv beside this script: 100 x 100 points in
each cell, each asked whether it lies inside the outlines, whose vertices were projected with PROJ.
"""
import csv
import json
import pathlib
import random
import sys

import netCDF4
import numpy
from matplotlib.path import Path
from pyproj import Transformer

GRIDS = {
    "north-25km": (3411, 4054, 304, 448, 25000.0, -3850000.0, 5850000.0),
    "south-25km": (3412, 4054, 316, 332, 25000.0, -3950000.0, 4350000.0),
    "north-6.25km-wgs84": (3413, 4326, 1216, 1792, 6250.0, -3850000.0, 5850000.0),
    "south-12.5km-wgs84": (3976, 4326, 632, 664, 12500.0, -3950000.0, 4350000.0),
    "north-25km-equal-area": (6931, 4326, 720, 720, 25000.0, -9000000.0, 9000000.0),
    "south-25km-equal-area": (6932, 4326, 720, 720, 25000.0, -9000000.0, 9000000.0),
}
CELLS_A_GRID = 15


def topology_polygons(path):
    topology = json.load(open(path))
    scale, translate = (numpy.array(topology["transform"][key]) for key in ("scale", "translate"))
    arcs = [numpy.cumsum(numpy.array(arc), axis=0) * scale + translate for arc in topology["arcs"]]
    for geometry in topology["objects"]["land"]["geometries"]:
        for rings in geometry["arcs"] if geometry["type"] == "MultiPolygon" else [geometry["arcs"]]:
            yield [numpy.concatenate([arcs[i] if i >= 0 else arcs[~i][::-1] for i in ring]) for ring in rings]


def ice_front_polygons(path):
    data = netCDF4.Dataset(path)
    data.set_auto_mask(False)
    size = data["Bin_size_in_minutes"][0] / 60.0
    around = data["N_bins_in_360_longitude_range"][0]
    counts = data["N_segments_in_a_bin"][:]
    bins = numpy.repeat(numpy.arange(len(counts)), counts)
    points = data["Embedded_npts_levels_exit_entry_for_a_segment"][:] >> 9
    first = data["Id_of_first_point_in_a_segment"][:]
    east = data["Relative_longitude_from_SW_corner_of_bin"][:].astype(numpy.uint16) / 65535.0 * size
    north = data["Relative_latitude_from_SW_corner_of_bin"][:].astype(numpy.uint16) / 65535.0 * size
    open_segments = {}
    for segment in numpy.nonzero(data["Embedded_ANT_flag"][:] == 1)[0]:
        part = slice(first[segment], first[segment] + points[segment])
        longitude = (bins[segment] % around * size + east[part]) % 360.0
        latitude = 90.0 - (bins[segment] // around + 1) * size + north[part]
        line = numpy.column_stack([longitude, latitude]).round(7)
        if (line[0] == line[-1]).all():
            yield [line]
        else:
            open_segments[tuple(line[0])] = line
    while open_segments:
        start, line = open_segments.popitem()
        ring = [line]
        while tuple(ring[-1][-1]) != start:
            ring.append(open_segments.pop(tuple(ring[-1][-1]))[1:])
        yield [numpy.concatenate(ring)]


def course(ring, forward):
    """The ring on the map, each edge in 20 pieces that are even in longitude and latitude and go the short way."""
    step = numpy.diff(ring, axis=0)
    step[:, 0] = (step[:, 0] + 180.0) % 360.0 - 180.0
    pieces = ring[:-1, None, :] + step[:, None, :] * (numpy.arange(20) / 20.0)[None, :, None]
    return numpy.column_stack(forward.transform(pieces[:, :, 0].ravel(), pieces[:, :, 1].ravel()))


def projected(polygons, forward, side):
    for rings in polygons:
        # Rings of the other half of the Earth and the pinhole at the south pole.
        rings = [ring for ring in rings if (ring[:, 1] * side).max() > 0 and (abs(ring[:, 1]) < 89.9).all()]
        if rings:
            paths = [Path(course(ring, forward)) for ring in rings]
            yield paths[0].get_extents(), paths


def share(paths, x, y, cell, count):
    steps = (numpy.arange(count) + 0.5) / count * cell
    points = numpy.column_stack([axis.ravel() for axis in numpy.meshgrid(x + steps, y - steps)])
    land = numpy.zeros(len(points), bool)
    for box, rings in paths:
        if box.x1 >= x and box.x0 <= x + cell and box.y1 >= y - cell and box.y0 <= y:
            inside = rings[0].contains_points(points)
            for hole in rings[1:]:
                inside &= ~hole.contains_points(points)
            land |= inside
    return land.mean()


outlines = list(topology_polygons(sys.argv[1])) + list(ice_front_polygons(sys.argv[2]))
chance = random.Random(22)
with open(pathlib.Path(__file__).with_name("land-shares.csv"), "w", newline="") as file:
    writer = csv.writer(file, lineterminator="\n")
    writer.writerow(["grid", "row", "column", "land_share"])
    for name, (code, base, columns, rows, cell, left, top) in GRIDS.items():
        side = 1 if name.startswith("north") else -1
        paths = list(projected(outlines, Transformer.from_crs(base, code, always_xy=True), side))
        inverse = Transformer.from_crs(code, base, always_xy=True)
        found = 0
        while found < CELLS_A_GRID:
            row, column = chance.randrange(rows), chance.randrange(columns)
            x, y = left + column * cell, top - row * cell
            if inverse.transform(x, y)[1] * side > 5 and 0 < share(paths, x, y, cell, 4) < 1:
                writer.writerow([name, row, column, f"{share(paths, x, y, cell, 100):.4f}"])
                found += 1
