"""Reads the atomic tables and puts every wavelength into standard air by one formula."""
import csv
import math
import os

CM1_PER_EV = 8065.543937  # CODATA 2018: 1 eV / (h c)
NIST = "NIST ASD"
CITATION = ("Kramida, Ralchenko, Reader and the NIST ASD Team, NIST Atomic Spectra Database, "
            "National Institute of Standards and Technology, doi 10.18434/T4W30F")


def air_ciddor(vacuum):
    """Ciddor (1996), Applied Optics 35, 1566: standard air, 15 C, 101325 Pa, 450 ppm CO2."""
    s2 = (1e4 / vacuum) ** 2
    return vacuum / (1.0 + 1e-8 * (5792105.0 / (238.0185 - s2) + 167917.0 / (57.362 - s2)))


def air_peck_reeder(vacuum):
    """Peck and Reeder (1972), J. Opt. Soc. Am. 62, 958: the formula by which NIST prints air wavelengths."""
    s2 = (1e4 / vacuum) ** 2
    return vacuum / (1.0 + 1e-8 * (8060.51 + 2480990.0 / (132.274 - s2) + 17455.7 / (39.32957 - s2)))


def vacuum_of_nist_air(air):
    vacuum = air * 1.00028
    for _ in range(6):
        vacuum += air - air_peck_reeder(vacuum)
    return vacuum


def number(text):
    return float(text) if text else math.nan


def half_step(text):
    """Half a unit of the last digit printed."""
    return 0.5 * 10.0 ** -(len(text.split(".")[1]) if "." in text else 0)


class Row:
    """One transition of the NIST table; wavelengths in angstrom, energies in 1/cm."""

    def __init__(self, record):
        self.species = record["species"] + " " + record["ion"]
        self.element, self.ion = record["species"], record["ion"]
        self.lower, self.upper = number(record["e_lower_cm1"]), number(record["e_upper_cm1"])
        self.log_gf, self.a_ki = number(record["log_gf"]), number(record["aki_per_s"])
        self.intensity = number(record["rel_intensity"])
        self.forbidden = record["transition_type"] != ""
        self.kind = record["wavelength_kind"]
        self.printed = record["wavelength_vac_angstrom"] if record["source"] == "N1" else record["wavelength_air_angstrom"]
        # N1 gives vacuum, N2 air by the formula of Peck and Reeder.
        value = float(self.printed)
        self.observed = value if record["source"] == "N1" else vacuum_of_nist_air(value)
        self.observed_error = half_step(self.printed)
        self.multiplet = (self.species, record["conf_lower"], record["term_lower"], record["conf_upper"], record["term_upper"])
        self.conf_lower, self.conf_upper = record["conf_lower"], record["conf_upper"]
        self.ritz = self.ritz_error = math.nan
        if self.upper > self.lower >= 0.0:
            self.ritz = 1e8 / (self.upper - self.lower)
            steps = half_step(record["e_lower_cm1"]), half_step(record["e_upper_cm1"])
            self.ritz_error = self.ritz ** 2 * 1e-8 * math.hypot(*steps)

    @property
    def agreement(self):
        """Distance of the printed wavelength from the difference of the levels."""
        return abs(self.observed - self.ritz)

    @property
    def vacuum(self):
        """The more finely given of the two, where they agree within their last digits and 0.01 angstrom."""
        fits = self.agreement < 0.01 + self.observed_error + self.ritz_error
        return self.ritz if fits and self.ritz_error < self.observed_error else self.observed

    @property
    def air(self):
        return air_ciddor(self.vacuum)


def read(folder, name):
    with open(os.path.join(folder, name), encoding="utf-8", newline="") as stream:
        return list(csv.DictReader(stream))


def nist_rows(folder):
    rows = [Row(record) for record in read(folder, "nist-lines.csv")]
    return sorted(rows, key=lambda row: row.vacuum)


def add_gf(rows):
    """log of the summed g f."""
    return math.log10(sum(10.0 ** row.log_gf for row in rows))


def centroid(rows):
    """Vacuum wavelength weighted by g f."""
    weights = [10.0 ** row.log_gf for row in rows]
    return sum(w * row.vacuum for w, row in zip(weights, rows)) / sum(weights)


def merged_source(parts):
    """Source of a line made of one row or several."""
    return NIST if len(parts) == 1 else f"{NIST}, {len(parts)} components weighted by g f"
