"""Balmer and Paschen lines."""
import atomic
from listfile import line

GREEK = {3: "alpha", 4: "beta", 5: "gamma", 6: "delta", 7: "epsilon"}
LAST_BALMER = 30
LAST_PASCHEN = 24


def gross(rows, lower, upper):
    """The row from all of one shell to all of another."""
    return next(r for r in rows if r.conf_lower == str(lower) and r.conf_upper == str(upper))


def fine_structure(rows, total):
    """The electric-dipole components of a gross line with their g f."""
    parts = [r for r in rows if r.conf_lower[-1:] in ("s", "p") and r.conf_lower[0] == total.conf_lower
             and r.conf_upper[:-1] == total.conf_upper and not r.forbidden and r.log_gf == r.log_gf
             and abs(r.vacuum - total.ritz) < 1.0]
    whole = sum(10.0 ** r.log_gf for r in parts)
    return parts if abs(whole / 10.0 ** total.log_gf - 1.0) < 0.01 else []


def lines(folder):
    rows = [r for r in atomic.nist_rows(folder) if r.species == "H I"]
    result, shifts = [], []
    for n in range(3, LAST_BALMER + 1):
        total = gross(rows, 2, n)
        parts = fine_structure(rows, total)
        if parts:
            vacuum = atomic.centroid(parts)
            shifts.append(1e8 / vacuum - 1e8 / total.ritz)
            source = atomic.NIST + ", centroid of fine structure weighted by g f"
        else:
            # The same weights put the lower shell higher by as much as in the lines whose components are known.
            vacuum = 1e8 / (total.upper - total.lower + sum(shifts[1:]) / len(shifts[1:]))
            source = atomic.NIST + " levels, lower shell weighted by g f"
        name = "H-" + GREEK[n] if n in GREEK else f"H{n}"
        result.append(make(total, vacuum, name, source))
    for n in range(6, LAST_PASCHEN + 1):
        total = gross(rows, 3, n)
        name = "Pa-" + GREEK[n - 1] if n < 8 else f"Pa{n}"
        result.append(make(total, total.ritz, name, atomic.NIST + " levels"))
    return [entry for entry in result if entry["wavelength"] < 11000.0]


def make(total, vacuum, name, source):
    return line("H I", atomic.air_ciddor(vacuum), source, name, total.lower / atomic.CM1_PER_EV, total.log_gf, total.a_ki)


METADATA = {
    "title": "Balmer and Paschen lines of hydrogen",
    "medium": "air",
    "source": "NIST Atomic Spectra Database; wavelengths are centroids of the fine structure, brought to standard air by Ciddor (1996)",
    "citation": atomic.CITATION,
}
