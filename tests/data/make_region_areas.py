"""Computes the areas of regions as geodesic polygons with GeographicLib (through pyproj).

Usage, from this folder: /usr/bin/python3 make_region_areas.py > region-areas.csv
Reads regions.geojson and config/regions/northern-seas.geojson. Edges are straight in longitude and latitude, so each is
cut into pieces of at most 0.01 degrees; longitudes run on across the date line, the short way. Areas in km² on the
ellipsoids of the grids, for each polygon whole, land and sea.
"""
import json
import math

from pyproj import Geod

GEODS = {"hughes-1980": Geod(a=6378273.0, rf=298.279411123064), "wgs-84": Geod(ellps="WGS84")}
STEP = 0.01


def densified(ring):
    longitudes, latitudes = [], []
    for (from_longitude, from_latitude), (to_longitude, to_latitude) in zip(ring, ring[1:]):
        step = math.remainder(to_longitude - from_longitude, 360.0)
        pieces = max(1, math.ceil(max(abs(step), abs(to_latitude - from_latitude)) / STEP))
        for piece in range(pieces):
            longitudes.append(from_longitude + step * piece / pieces)
            latitudes.append(from_latitude + (to_latitude - from_latitude) * piece / pieces)
    return longitudes, latitudes


def area(geod, polygon):
    sizes = []
    for ring in polygon:
        size = abs(geod.polygon_area_perimeter(*densified(ring))[0])
        whole = 4 * math.pi * 6371000.0 ** 2
        sizes.append(min(size, whole - size) if size > whole / 2 else size)
    return (sizes[0] - sum(sizes[1:])) / 1e6


print("file,region,ellipsoid,area_km2")
for file in ("tests/data/regions.geojson", "config/regions/northern-seas.geojson"):
    with open("../../" + file, encoding="utf-8") as source:
        features = json.load(source)["features"]
    for feature in features:
        geometry = feature["geometry"]
        polygons = geometry["coordinates"] if geometry["type"] == "MultiPolygon" else [geometry["coordinates"]]
        for name, geod in GEODS.items():
            total = sum(area(geod, polygon) for polygon in polygons)
            print(f"{file},{feature['properties']['name']},{name},{total:.3f}")
