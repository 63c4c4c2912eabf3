"""Share of places that no swath covers in a day, by latitude: orbits flown step by step over a turning Earth.

Shares nothing with the program, which works with intervals of node longitudes and leaves the turning out.
Usage: python3 swath_gaps.py > swath_gaps.csv
"""
import numpy as np

SWATH_KM, ORBITS, INCLINATION, RADIUS_KM = 1394.0, 14.1, np.radians(98.8), 6371.0


def turned(vectors, days):
    """Into a frame that turns with the Earth (sun-synchronous: once a day)."""
    turn = -2 * np.pi * days
    x, y, z = vectors
    return np.stack([x * np.cos(turn) - y * np.sin(turn), x * np.sin(turn) + y * np.cos(turn), z], axis=-1)


def orbit(days):
    """Unit vectors below the satellite and along its flight in space: the scan reaches out across the latter."""
    u = 2 * np.pi * ORBITS * days
    below = np.cos(u), np.sin(u) * np.cos(INCLINATION), np.sin(u) * np.sin(INCLINATION)
    flight = -np.sin(u), np.cos(u) * np.cos(INCLINATION), np.cos(u) * np.sin(INCLINATION)
    return turned(below, days), turned(flight, days)


if __name__ == "__main__":
    days = np.arange(0, 1, 1 / (14.1 * 600))
    at, motion = orbit(days)
    print("latitude_degrees,share_lost")
    for latitude in (20, 30, 35, 40, 45, 50, 55, 60, 65):
        lon = np.radians(np.arange(0, 360, 0.25))
        lat = np.radians(latitude)
        place = np.stack([np.cos(lat) * np.cos(lon), np.cos(lat) * np.sin(lon), np.full_like(lon, np.sin(lat))], axis=-1)
        seen = np.zeros(lon.size, bool)
        for chunk in range(0, days.size, 500):
            s = slice(chunk, chunk + 500)
            along = np.abs(place @ motion[s].T) < 0.012          # abreast of the satellite
            near = place @ at[s].T > np.cos(SWATH_KM / 2 / RADIUS_KM)  # and within half the swath
            seen |= np.any(along & near, axis=1)
        print(f"{latitude},{1 - seen.mean():.4f}")
