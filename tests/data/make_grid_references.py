"""Computes the independent numbers of the grid tests with PROJ and GeographicLib (through pyproj).

Usage, from this folder: /usr/bin/python3 make_grid_references.py
Writes proj-positions.csv and cell-areas.csv. Reads nothing but pyproj's own database: sizes of grids are repeated
here by hand, so that a slip in config/grids cannot hide.
"""
import csv
import random

from pyproj import Geod, Transformer

GRIDS = {}
for hemisphere, (columns, rows, left, top) in {
    "north": (304, 448, -3850000.0, 5850000.0),
    "south": (316, 332, -3950000.0, 4350000.0),
}.items():
    for size, factor in (("25km", 1), ("12.5km", 2), ("6.25km", 4)):
        for suffix, codes in (("", {"north": 3411, "south": 3412}), ("-wgs84", {"north": 3413, "south": 3976})):
            GRIDS[f"{hemisphere}-{size}{suffix}"] = (
                codes[hemisphere], columns * factor, rows * factor, 25000.0 / factor, left, top)
for hemisphere, code in (("north", 6931), ("south", 6932)):
    GRIDS[f"{hemisphere}-25km-equal-area"] = (code, 720, 720, 25000.0, -9000000.0, 9000000.0)

# Geographic positions in the ellipsoid of the map, without a change of datum.
BASE = {3411: 4054, 3412: 4054, 3413: 4326, 3976: 4326, 6931: 4326, 6932: 4326}
GEOD = {4054: Geod(a=6378273.0, rf=298.279411123064), 4326: Geod(ellps="WGS84")}
POINTS_ON_A_SIDE = 200


def positions(writer):
    chance = random.Random(20)
    for name, (code, columns, rows, cell, left, top) in GRIDS.items():
        inverse = Transformer.from_crs(code, BASE[code], always_xy=True)
        forward = Transformer.from_crs(BASE[code], code, always_xy=True)
        places = [(left, top), (left + columns * cell, top - rows * cell), (cell / 7.0, -cell / 9.0)]
        while len(places) < 20:
            places.append((left + chance.random() * columns * cell, top - chance.random() * rows * cell))
        for x, y in places:
            longitude, latitude = (round(value, 9) for value in inverse.transform(x, y))
            x, y = forward.transform(longitude, latitude)
            writer.writerow([name, f"{latitude:.9f}", f"{longitude:.9f}", f"{x:.8f}", f"{y:.8f}"])


def area(name, row, column):
    code, columns, rows, cell, left, top = GRIDS[name]
    inverse = Transformer.from_crs(code, BASE[code], always_xy=True)
    x, y = left + column * cell, top - row * cell
    steps = [index * cell / POINTS_ON_A_SIDE for index in range(POINTS_ON_A_SIDE)]
    xs = [x + s for s in steps] + [x + cell] * len(steps) + [x + cell - s for s in steps] + [x] * len(steps)
    ys = [y] * len(steps) + [y - s for s in steps] + [y - cell] * len(steps) + [y - cell + s for s in steps]
    longitudes, latitudes = inverse.transform(xs, ys)
    return abs(GEOD[BASE[code]].polygon_area_perimeter(longitudes, latitudes)[0])


def cells(writer):
    chance = random.Random(21)
    for name, (_, columns, rows, _, left, top) in GRIDS.items():
        chosen = [(0, 0), (0, columns - 1), (rows - 1, 0), (rows - 1, columns - 1)]
        # The cells around the pole, where the areal scale is largest.
        cell = GRIDS[name][3]
        chosen.append((int(top / cell), int(-left / cell)))
        chosen.append((int(top / cell) - 1, int(-left / cell) - 1))
        while len(chosen) < 24:
            chosen.append((chance.randrange(rows), chance.randrange(columns)))
        for row, column in chosen:
            writer.writerow([name, row, column, f"{area(name, row, column):.3f}"])


def write(path, header, fill):
    with open(path, "w", newline="") as file:
        writer = csv.writer(file, lineterminator="\n")
        writer.writerow(header)
        fill(writer)


write("proj-positions.csv", ["grid", "latitude", "longitude", "x_m", "y_m"], positions)
write("cell-areas.csv", ["grid", "row", "column", "area_m2"], cells)
