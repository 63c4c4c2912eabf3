"""Computes distances and cells near places with PROJ and GeographicLib (through pyproj).

Usage, from this folder: /usr/bin/python3 make_place_references.py
Writes geodesic-distances.csv and place-cells.csv. Cells are those of the grid north-25km, land and sea; its numbers are repeated
here by hand. Lines are straight in longitude and latitude and are sampled every 0.001 of their length.
"""
import csv
import random

import numpy as np
from pyproj import Geod, Transformer

GEODS = {"hughes-1980": Geod(a=6378273.0, rf=298.279411123064), "wgs-84": Geod(ellps="WGS84")}
COLUMNS, ROWS, CELL, LEFT, TOP = 304, 448, 25000.0, -3850000.0, 5850000.0
PLACES = {
    "coast": ([(33.5, 69.2)], 100.0),
    "date-line": ([(180.0, 70.0)], 120.0),
    "pole": ([(0.0, 90.0)], 150.0),
    "far-south": ([(-52.0, 47.0)], 500.0),
    "line": ([(55.0, 69.0), (75.0, 74.0), (80.0, 77.0)], 60.0),
    "line-over-the-date-line": ([(170.0, 70.0), (195.0, 71.0)], 45.0),
}


def distances():
    chance = random.Random(7)
    pairs = [(70, 10, 70, 10), (90, 0, 80, 33), (-90, 0, -90, 50), (0, 10, 0, 20), (72, 179.5, 72.5, -179.5), (60, 10, 60, 370)]
    for reach in (0.01, 1.0, 30.0, 90.0):
        for _ in range(8):
            latitude, longitude = chance.uniform(-88, 88), chance.uniform(-180, 180)
            pairs.append((latitude, longitude, max(-90, min(90, latitude + chance.uniform(-reach, reach))), longitude + chance.uniform(-reach, reach)))
    with open("geodesic-distances.csv", "w", newline="", encoding="utf-8") as file:
        writer = csv.writer(file, lineterminator="\n")
        writer.writerow(["ellipsoid", "from_latitude", "from_longitude", "to_latitude", "to_longitude", "distance_m"])
        for name, geod in GEODS.items():
            for pair in pairs:
                one, two, three, four = (round(value, 6) for value in pair)
                writer.writerow([name, one, two, three, four, f"{geod.inv(two, one, four, three)[2]:.6f}"])


def cells():
    geod = GEODS["hughes-1980"]
    columns, rows = np.meshgrid(np.arange(COLUMNS), np.arange(ROWS))
    x, y = LEFT + (columns + 0.5) * CELL, TOP - (rows + 0.5) * CELL
    longitudes, latitudes = Transformer.from_crs(3411, 4054, always_xy=True).transform(x.ravel(), y.ravel())
    with open("place-cells.csv", "w", newline="", encoding="utf-8") as file:
        writer = csv.writer(file, lineterminator="\n")
        writer.writerow(["place", "cells", "nearest_km", "farthest_km", "sum_of_distances_km", "sum_of_indices"])
        for name, (line, reach) in PLACES.items():
            course = []
            for start, end in zip(line, line[1:] or line):
                for share in np.linspace(0.0, 1.0, 1001 if len(line) > 1 else 1):
                    course.append((start[0] + share * (end[0] - start[0]), start[1] + share * (end[1] - start[1])))
            course = np.array(course)
            nearest = np.full(longitudes.shape, np.inf)
            coarse = course[::20] if len(course) > 1 else course
            for longitude, latitude in coarse:
                away = geod.inv(np.full_like(longitudes, longitude), np.full_like(latitudes, latitude), longitudes, latitudes)[2]
                nearest = np.minimum(nearest, away)
            near = np.flatnonzero(nearest < 1000.0 * (reach + 60.0))
            best = np.full(near.shape, np.inf)
            for longitude, latitude in course:
                away = geod.inv(np.full(near.shape, longitude), np.full(near.shape, latitude), longitudes[near], latitudes[near])[2]
                best = np.minimum(best, away)
            chosen = best <= 1000.0 * reach
            found = best[chosen] / 1000.0
            writer.writerow([name, chosen.sum(), f"{found.min():.4f}", f"{found.max():.4f}", f"{found.sum():.3f}", near[chosen].sum()])


distances()
cells()
