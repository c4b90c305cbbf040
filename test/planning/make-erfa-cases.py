#!/usr/bin/env python3
"""Makes erfa-cases.json: altitudes, azimuths, rises and sets by ERFA and DE405, without any code of this project.

Positions: DE405 as JPL made it (table.f0i of Debian's casacore-data-jpl-de405). Everything else: ERFA, the IAU's SOFA
routines (Debian's python3-erfa): time scales, WGS 84 (gd2gc), precession-nutation IAU 2006/2000A (pnm06a), Greenwich
apparent sidereal time (gst06a), light-time by iteration, aberration (ab) with the observer's own velocity, the turning
of the Earth included. No bending of light by the Sun, no polar motion, no refraction. UT1 - UTC: IERS EOP 20 C04 up to
its end, zero after it.

    make-erfa-cases.py TABLE.F0I EOPC04.1962-NOW > erfa-cases.json
"""
import json
import math
import sys

import erfa
import numpy as np
from numpy.polynomial import chebyshev

table = np.fromfile(sys.argv[1], dtype=np.uint8)
ROWS, FIRST, LENGTH, DOUBLES = 1143, 28, 8160, 1018
BEGIN = 2436912.5
LAYOUT = {"mercury": (0, 14, 4), "venus": (168, 10, 2), "emb": (228, 13, 2), "mars": (306, 11, 1), "jupiter": (339, 8, 1),
          "moon-geocentric": (438, 13, 8), "sun": (750, 11, 2)}
RATIO = 81.30056
LIGHT = 299792.458
AU = 149597870.7


def series(name, jd1, jd2):
    """Position (km) and velocity (km/s) from the table."""
    start, n, parts = LAYOUT[name]
    days = (jd1 - BEGIN) + jd2
    row = int(days // 32)
    inside = days - 32 * row
    part = min(int(inside // (32 / parts)), parts - 1)
    length = 32 / parts
    s = 2 * (inside - part * length) / length - 1
    at = FIRST + LENGTH * row
    values = np.frombuffer(table[at:at + 8 * DOUBLES].tobytes(), dtype="<f8")
    c = values[start + part * 3 * n:start + (part + 1) * 3 * n].reshape(3, n)
    position = np.array([chebyshev.chebval(s, c[i]) for i in range(3)])
    velocity = np.array([chebyshev.chebval(s, chebyshev.chebder(c[i])) for i in range(3)]) * 2 / (length * 86400)
    return position, velocity


def barycentric(name, jd1, jd2):
    if name in ("earth", "moon"):
        moon, moon_v = series("moon-geocentric", jd1, jd2)
        emb, emb_v = series("emb", jd1, jd2)
        share = -1 / (1 + RATIO) if name == "earth" else RATIO / (1 + RATIO)
        return emb + share * moon, emb_v + share * moon_v
    return series(name, jd1, jd2)


dut1_table = {}
for line in open(sys.argv[2]):
    parts = line.split()
    if len(parts) > 8 and parts[0].isdigit() and len(parts[0]) == 4:
        mjd = float(parts[4])
        dut1_table[round(mjd)] = float(parts[7])
LAST = max(dut1_table)


def dut1_of(mjd):
    day = math.floor(mjd)
    if day + 1 > LAST:
        return 0.0
    a, b = dut1_table[day], dut1_table[day + 1]
    if b - a > 0.5:
        b -= 1  # a leap second ends the day
    return a + (b - a) * (mjd - day)


def look(body, site, utc1, utc2):
    """Altitude and azimuth, degrees."""
    latitude, longitude, height = site
    tai = erfa.utctai(utc1, utc2)
    tt = erfa.taitt(*tai)
    dut1 = dut1_of(utc1 - 2400000.5 + utc2)
    ut1 = erfa.utcut1(utc1, utc2, dut1)
    tdb = tt  # within 2 ms
    gast = erfa.gst06a(*ut1, *tt)
    to_true = erfa.pnm06a(*tt)  # GCRS to true equator and equinox
    to_earth = erfa.rz(gast, to_true)
    fixed = erfa.gd2gc(1, math.radians(longitude), math.radians(latitude), height) / 1000
    spin = np.array([0, 0, 7.292115855e-5])
    place = to_earth.T @ fixed
    place_v = to_earth.T @ np.cross(spin, fixed)
    earth, earth_v = barycentric("earth", *tdb)
    observer, observer_v = earth + place, earth_v + place_v
    light = 0.0
    for _ in range(4):
        there, _v = barycentric(body, tdb[0], tdb[1] - light / 86400)
        seen = there - observer
        light = np.linalg.norm(seen) / LIGHT
    beta = observer_v / LIGHT
    sun, _v = barycentric("sun", *tdb)
    direction = erfa.ab(seen / np.linalg.norm(seen), beta, np.linalg.norm(sun - observer) / AU,
                        math.sqrt(1 - float(beta @ beta)))
    d = to_earth @ direction
    sl, cl = math.sin(math.radians(longitude)), math.cos(math.radians(longitude))
    sp, cp = math.sin(math.radians(latitude)), math.cos(math.radians(latitude))
    east = -sl * d[0] + cl * d[1]
    north = -sp * cl * d[0] - sp * sl * d[1] + cp * d[2]
    up = cp * cl * d[0] + cp * sl * d[1] + sp * d[2]
    return math.degrees(math.atan2(up, math.hypot(east, north))), math.degrees(math.atan2(east, north)) % 360


def iso(utc1, utc2):
    y, m, d, hmsf = erfa.d2dtf("UTC", 3, utc1, utc2)
    h, mi, s, f = (int(hmsf[k]) for k in ("h", "m", "s", "f"))
    return f"{int(y):04d}-{int(m):02d}-{int(d):02d}T{h:02d}:{mi:02d}:{s:02d}.{f:03d}Z"


SITES = [(90, 0, 0), (-90, 0, 2835), (0, 180, 0), (31.5, 35.5, -430), (28, 86.9, 8849), (46.5, 8, 2100), (-33.9, 18.5, 10),
         (69.6, 18.9, 20), (-77.8, 166.7, 30), (19.8, -155.5, 4200)]
BODIES = ["moon", "venus", "mars", "jupiter", "sun"]

places, crossings = [], []
for i in range(50):
    body, site = BODIES[i % 5], SITES[(i + i // 10) % 10]
    mjd = 41700 + 521.37 * i  # 1973 to 2043
    utc = (2400000.5, mjd)
    text = iso(*utc)
    day = math.floor(mjd)
    seconds = round((mjd - day) * 86400, 3)
    utc = (2400000.5 + day, seconds / 86400)
    altitude, azimuth = look(body, site, *utc)
    places.append({"body": body, "site": list(site), "utc": iso(*utc), "altitudeDeg": round(altitude, 6),
                   "azimuthDeg": round(azimuth, 6)})

for i in range(40):
    body, site = BODIES[i % 5], SITES[2 + (i + i // 5) % 8]
    mjd = 42100 + 611.0 * i
    step = 1 / 144
    for k in range(180):
        a = look(body, site, 2400000.5 + mjd, k * step)[0]
        b = look(body, site, 2400000.5 + mjd, (k + 1) * step)[0]
        if a < 0 <= b or b < 0 <= a:
            if abs(b - a) / (step * 1440) < 0.05:
                break  # grazing: less than 3 minutes of arc a minute of time
            low, high = k * step, (k + 1) * step
            for _ in range(40):
                middle = (low + high) / 2
                if (look(body, site, 2400000.5 + mjd, middle)[0] < 0) == (a < 0):
                    low = middle
                else:
                    high = middle
            crossings.append({"body": body, "site": list(site), "utc": iso(2400000.5 + mjd, low), "what": "rise" if a < 0 else "set"})
            break

print(json.dumps({
    "source": "ERFA " + erfa.__version__ + " (Debian's python3-erfa) and JPL DE405 (Debian's casacore-data-jpl-de405), by make-erfa-cases.py; "
              "UT1-UTC from IERS EOP 20 C04, zero after its end",
    "places": places, "crossings": crossings}, indent=1))
