"""Checks with PROJ (through pyproj) that the texts in crs-texts/ are the systems of their codes.

Usage, from this folder: /usr/bin/python3 check_crs_texts.py
Reads crs-texts/<code>.wkt, writes crs-check.csv: the code PROJ reads the text
as, whether it takes text and database entry for equivalent, the same once the code at the end of the text is taken
away, and the largest distance between the positions both give.
"""
import csv
import pathlib
import re

from pyproj import CRS, Transformer

PLACES = [(longitude, latitude) for longitude in range(-180, 181, 15) for latitude in (35, 45, 60, 72, 85, 89.9)]

with open("crs-check.csv", "w", newline="") as file:
    writer = csv.writer(file, lineterminator="\n")
    writer.writerow(["epsg", "read_as", "equivalent", "equivalent_without_code", "largest_distance_m"])
    for path in sorted(pathlib.Path("crs-texts").glob("*.wkt")):
        code = int(path.stem)
        text = path.read_text().strip()
        bare = CRS.from_wkt(re.sub(r',ID\["EPSG",\d+\]\]$', "]", text))
        own, database = CRS.from_wkt(text), CRS.from_epsg(code)
        base = database.geodetic_crs.to_epsg()
        side = -1 if code in (3412, 3976, 6932) else 1
        longitudes, latitudes = zip(*[(x, y * side) for x, y in PLACES])
        one = Transformer.from_crs(base, own, always_xy=True).transform(longitudes, latitudes)
        # Through the bare text, so that nothing can be looked up by the code instead of computed from the numbers.
        other = Transformer.from_crs(bare.geodetic_crs, bare, always_xy=True).transform(longitudes, latitudes)
        expected = Transformer.from_crs(base, database, always_xy=True).transform(longitudes, latitudes)
        distance = max(
            ((x - u) ** 2 + (y - v) ** 2) ** 0.5
            for x, y, u, v in zip(one[0] + other[0], one[1] + other[1], expected[0] * 2, expected[1] * 2))
        writer.writerow([
            code, own.to_epsg(), database.equals(own), database.equals(bare), f"{distance:.9f}"])
