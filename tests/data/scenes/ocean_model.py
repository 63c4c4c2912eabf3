"""Brightness temperature of the open sea: an independent working of the formulas of Wentz & Meissner (2000).

Prints comma-separated rows for the tests of IceExtent.Scenes. Shares no code with the program: the Fresnel
amplitudes go through the refractive index and the angle of refraction, the polynomials through numpy.polyval.
Every constant is a value from memory, the same as the program's.

Usage: python3 ocean_model.py > ocean_model.csv
"""
import numpy as np

SPACE = 2.7
LIGHT = 2.99792458e10  # cm/s

AIR = {  # b0..b4, b5, b6, b7, aO1, aO2, aV1, aV2, aL1, aL2
    18.7: ([240.24, 298.88e-2, -725.93e-4, 814.50e-6, -36.07e-7], 0.61, -0.16, -1.69e-2,
           12.15e-3, -0.61e-4, 1.73e-3, -0.05e-5, 0.0556, 0.0288),
    23.8: ([241.69, 310.32e-2, -814.29e-4, 998.93e-6, -48.37e-7], 0.20, -0.20, -5.21e-2,
           15.75e-3, -0.87e-4, 5.14e-3, 0.19e-5, 0.0891, 0.0281),
    36.5: ([239.45, 254.41e-2, -512.84e-4, 452.02e-6, -14.36e-7], 0.58, -0.57, -2.38e-2,
           40.06e-3, -2.00e-4, 1.88e-3, 0.09e-5, 0.2027, 0.0261),
}
SEA = {  # r0, r1, r2, m1, m2
    (18.7, "v"): (-0.49e-3, -0.53e-4, 0.48e-5, 0.00140, 0.00736),
    (18.7, "h"): (1.13e-3, 0.70e-4, 0.0, 0.00293, 0.00656),
    (23.8, "v"): (-0.63e-3, -0.70e-4, 0.75e-5, 0.00178, 0.00730),
    (23.8, "h"): (1.39e-3, 0.85e-4, 0.0, 0.00308, 0.00660),
    (36.5, "v"): (-1.01e-3, -1.05e-4, 1.27e-5, 0.00257, 0.00701),
    (36.5, "h"): (1.91e-3, 1.12e-4, 0.0, 0.00329, 0.00660),
}


def permittivity(f, kelvins, s):
    t, lam = kelvins - 273.15, LIGHT / (f * 1e9)
    eps_s = 87.90 * np.exp(-0.004585 * t - 3.45e-3 * s + 4.69e-6 * s**2 + 1.36e-5 * s * t)
    lam_r = 3.30 * np.exp(-0.0346 * t + 0.00017 * t**2) - 6.54e-3 * (1 - 3.06e-2 * t + 2.0e-4 * t**2) * s
    c, d = 0.5536 * s, 25.0 - t
    zeta = np.polyval([2.46e-6, 1.27e-4, 2.03e-2], d) - c * np.polyval([4.60e-8, -4.60e-7, 3.34e-5], d)
    sigma = 3.39e9 * c**0.892 * np.exp(-d * zeta)
    relax = np.exp(0.988 * (np.log(lam_r / lam) + 0.5j * np.pi))
    return 4.44 + (eps_s - 4.44) / (1 + relax) - 2j * sigma * lam / LIGHT


def brightness(f, pol, theta, ts, w, v, liquid, s=33.0):
    b, b5, b6, b7, ao1, ao2, av1, av2, al1, al2 = AIR[f]
    tv = 273.16 + 0.8337 * v - 3.029e-5 * v**3.33 if v <= 48 else 301.16
    d = ts - tv
    zeta = 1.05 * d * (1 - d * d / 1200) if abs(d) <= 20 else 14 * np.sign(d)
    td = np.polyval(b[::-1], v) + b5 * zeta
    tu = td + b6 + b7 * v
    tl = (tu + 273) / 2
    tau = np.exp(-(ao1 + ao2 * (td - 270) + av1 * v + av2 * v * v + al1 * (1 - al2 * (tl - 283)) * liquid)
                 / np.cos(np.radians(theta)))
    n = np.sqrt(permittivity(f, ts, s))
    ci = np.cos(np.radians(theta))
    ct = np.sqrt(1 - (np.sin(np.radians(theta)) / n)**2)
    if pol == "v":
        calm = abs((n * ci - ct) / (n * ci + ct))**2 + 4.887e-8 - 6.108e-8 * (ts - 273)**3
    else:
        calm = abs((ci - n * ct) / (ci + n * ct))**2
    r0, r1, r2, m1, m2 = SEA[f, pol]
    geo = calm - (r0 + r1 * (theta - 53) + r2 * (ts - 288)) * w
    w1, w2 = (3.0 if pol == "v" else 7.0), 12.0
    if w < w1:
        foam = m1 * w
    elif w <= w2:
        foam = m1 * w + (m2 - m1) * (w - w1)**2 / (2 * (w2 - w1))
    else:
        foam = m2 * w - (m2 - m1) * (w2 + w1) / 2
    r = (1 - foam) * geo
    var = min(5.22e-3 * (1 - 0.00748 * (37 - f)**1.3) * w, 0.069)
    x = var - 70 * var**3
    omega = (2.5 + 0.018 * (37 - f)) * x * tau**3.4 if pol == "v" else (6.2 - 0.001 * (37 - f)**2) * x * tau**2
    sky = (1 + omega) * (1 - tau) * (td - SPACE) + SPACE
    return tu * (1 - tau) + tau * ((1 - r) * ts + r * sky)


if __name__ == "__main__":
    print("frequency_ghz,polarization,incidence_degrees,sea_kelvins,wind_ms,vapor_mm,cloud_mm,brightness_kelvins")
    draw = np.random.default_rng(20000)
    for _ in range(20):
        theta = float(draw.choice([50.3, 53.1, 55.0]))
        ts, w = draw.uniform(271.35, 295), draw.uniform(0, 28)
        v, liquid = draw.uniform(0.5, 35), draw.uniform(0, 0.8)
        theta, ts, w, v, liquid = (round(float(x), 4) for x in (theta, ts, w, v, liquid))
        for f, pol in SEA:
            print(f"{f},{pol},{theta},{ts},{w},{v},{liquid},{brightness(f, pol, theta, ts, w, v, liquid):.6f}")
