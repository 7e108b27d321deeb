#!/usr/bin/python3
"""Makes ../earth-motion.bin, the Chebyshev series of the barycentric correction.

    python3 earth_motion.py FOLDER_OF_DE405 ../earth-motion.bin

Sources
    Earth and Sun, barycentric, ICRF axes: ephemeris DE405 of the Jet Propulsion Laboratory (Standish 1998, JPL IOM
    312.F-98-048), public domain; here from the raw coefficient file table.f0i of the Debian package casacore-data-jpl-de405
    2007.07.05.
    Celestial intermediate pole X, Y and CIO locator s + XY/2: IAU 2006 precession, IAU 2000A nutation, by pyerfa 2.0.0.1
    (ERFA 2.0.0), function xys06a.
    TDB - TT at the centre of the Earth: Fairhead & Bretagnon (1990), A&A 229, 240, full series, by pyerfa, function dtdb.

File: lines of ASCII text, the first naming the format; one line a series,
    name unit quantum start_jd step_days segments coefficients
then an empty line, then for each series, segment by segment, each coefficient in units of the quantum as a zigzag
base-128 number (least significant group first, high bit set on all bytes but the last of a number).
A segment's value is sum c_k T_k(u), u = 2 (t - start of segment)/step - 1; the argument is TDB for Earth, Sun, else TT.
"""
import os
import sys

import erfa
import numpy as np
from numpy.polynomial import chebyshev

START = 2436912.5            # 1959-12-10, the first record of that file
END = 2473488.5              # 2060-01-30, the end of the last
DE405_AU_KM = 149597870.691  # the ephemeris is in km; the unit is only used to find its start
EARTH_MOON_RATIO = 81.30056  # DE405 header, EMRAT
# DE405 header, GROUP 1050, offsets counted after the two dates of each record: first word, coefficients, parts of 32 days.
LAYOUT = {"barycentre": (228, 13, 2), "moon": (438, 13, 8), "sun": (750, 11, 2)}


class De405:
    def __init__(self, folder):
        raw = open(os.path.join(folder, "table.f0i"), "rb").read()
        count = (len(raw) - 12) // 8160
        cells = np.frombuffer(raw, dtype=np.uint8)[12:12 + count * 8160].reshape(count, 8160)
        self.records = cells[:, 16:].copy().view("<f8")
        self.start = self._find_start()

    def _body(self, body, record, part_of_record):
        first, order, parts = LAYOUT[body]
        x = part_of_record * parts
        part = np.minimum(x.astype(int), parts - 1)
        words = first + part[:, None] * 3 * order + np.arange(3 * order)
        c = np.take_along_axis(self.records[record], words, axis=1).reshape(-1, 3, order)
        u = 2 * (x - part) - 1
        t = np.cos(np.arange(order)[None, :] * np.arccos(np.clip(u, -1, 1))[:, None])
        return np.einsum("nij,nj->ni", c, t)

    def _find_start(self):
        """The file does not say where it starts: records begin at JD 2305424.5 + 32 n, and only one n fits a known Earth."""
        middle = len(self.records) // 2
        there = self._body("barycentre", np.array([middle]), np.array([0.5]))[0]
        best = None
        for n in range(8000):
            jd = 2305424.5 + 32 * (n + middle) + 16
            if 2415000 < jd < 2488000:
                away = np.linalg.norm(erfa.epv00(jd, 0.0)[1]["p"] * DE405_AU_KM - there)
                if best is None or away < best[0]:
                    best = (away, jd - 32 * middle - 16)
        assert best[0] < 1e5, best
        return best[1]

    def metres(self, body, day, fraction):
        x = (day - self.start + fraction) / 32.0
        record = np.floor(x).astype(int)
        part = ((day - self.start - 32.0 * record) + fraction) / 32.0
        if body == "earth":
            moon = self._body("moon", record, part)
            return 1e3 * (self._body("barycentre", record, part) - moon / (1 + EARTH_MOON_RATIO))
        return 1e3 * self._body(body, record, part)


def series(function, step, order):
    """Coefficients [segment, component, k] of function(day, fraction), by interpolation at 2 order + 4 Chebyshev nodes."""
    count = round((END - START) / step)
    nodes = 2 * order + 4
    theta = np.pi * (np.arange(nodes) + 0.5) / nodes
    u = np.cos(theta)
    starts = START + step * np.arange(count)
    day = np.repeat(starts, nodes)
    fraction = np.tile(0.5 * step * (u + 1), count)
    values = function(day, fraction).reshape(count, nodes, -1)
    weights = 2.0 / nodes * np.cos(np.outer(np.arange(order), theta))
    weights[0] *= 0.5
    return np.einsum("kn,snc->sck", weights, values)


def pole(day, fraction):
    x, y, _ = erfa.xys06a(day, fraction)
    return np.stack([x, y], axis=-1)


def locator(day, fraction):
    x, y, s = erfa.xys06a(day, fraction)
    return (s + x * y / 2)[:, None]


def clock(day, fraction):
    return erfa.dtdb(day, fraction, 0.0, 0.0, 0.0, 0.0)[:, None]


def worst(function, coefficients, quantum, step):
    """Largest error of value and of rate a second at 40 000 dates, with the coefficients as they are stored."""
    rng = np.random.default_rng(1)
    t = rng.uniform(START, END - 1, 40000)
    day = np.floor(t) + 0.5
    fraction = t - day
    c = np.round(coefficients / quantum) * quantum
    x = (day - START + fraction) / step
    i = np.floor(x).astype(int)
    u = 2 * (x - i) - 1
    value = np.stack([[chebyshev.chebval(a, k) for k in c[b]] for a, b in zip(u, i)])
    h = 1.0 / 128
    rate = (function(day, fraction + h) - function(day, fraction - h)) / (2 * h * 86400)
    slope = np.stack([[chebyshev.chebval(a, chebyshev.chebder(k)) for k in c[b]] for a, b in zip(u, i)]) * 2 / step / 86400
    return np.abs(value - function(day, fraction)).max(), np.abs(slope - rate).max()


def packed(coefficients, quantum):
    out = bytearray()
    for number in np.round(coefficients / quantum).astype(np.int64).ravel().tolist():
        number = (number << 1) ^ (number >> 63)
        while number >= 128:
            out.append(number & 127 | 128)
            number >>= 7
        out.append(number)
    return bytes(out)


def main():
    ephemeris = De405(sys.argv[1])
    plan = [
        ("earth", "m", 1.0 / 8, 16.0, 16, lambda d, f: ephemeris.metres("earth", d, f)),
        ("sun", "m", 1.0, 72.0, 11, lambda d, f: ephemeris.metres("sun", d, f)),
        ("pole", "rad", 2.0 ** -35, 8.0, 8, pole),
        ("locator", "rad", 2.0 ** -35, 72.0, 6, locator),
        ("clock", "s", 2.0 ** -27, 32.0, 9, clock),
    ]
    header = [
        "StarLines Chebyshev series, format 1",
        "# Earth and Sun: JPL DE405; pole and locator: IAU 2006/2000A; clock (TDB - TT): Fairhead & Bretagnon 1990.",
        "# Made by make/earth_motion.py, which describes the file. Includes material of the U.S. Government (JPL DE405), not subject to copyright.",
    ]
    body = b""
    for name, unit, quantum, step, order, function in plan:
        c = series(function, step, order)
        data = packed(c, quantum)
        header.append("series %s %s %.17g %.1f %g %d %d %d" % (name, unit, quantum, START, step, c.shape[0], c.shape[1], order))
        print(header[-1], len(data), "bytes; worst error of value and rate a second:", worst(function, c, quantum, step))
        body += data
    with open(sys.argv[2], "wb") as file:
        file.write(("\n".join(header) + "\n\n").encode("ascii") + body)


main()
