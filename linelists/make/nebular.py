"""Emission lines of nebulae."""
import math
import atomic
import balmer
from listfile import line

BLUE, RED = 3700.0, 10000.0
# Pairs of terms that shine in nebulae and the terms' names; weaker pairs of the table are left out.
FAINT = {("O III", 4931), ("O I", 6391), ("N II", 6527), ("Ne III", 4011), ("Ar III", 8036), ("S III", 8829), ("Ar V", 6133), ("Cl II", 9380),
         ("S III", 3797), ("Ar IV", 7332), ("Cl II", 6161), ("S I", 4507), ("S I", 4589), ("C I", 4621), ("C I", 4627), ("Cl III", 8547)}
# Recombination of hydrogen at 10 000 K and 100 electrons/cm3, H-beta = 100: Osterbrock and Ferland (2006), table 4.4; from memory.
CASE_B = {"H-alpha": 286.0, "H-beta": 100.0, "H-gamma": 46.8, "H-delta": 25.9, "H-epsilon": 15.9, "H8": 10.5, "H9": 7.3, "H10": 5.3}
HELIUM = (3888.64, 4026.19, 4471.48, 4713.15, 4921.93, 5015.68, 5875.62, 6678.15, 7065.19, 7281.35)
MERGE = 0.25


def lines(folder):
    rows = atomic.nist_rows(folder)
    return forbidden(folder, rows) + hydrogen(folder) + helium(folder, rows)


def forbidden(folder, rows):
    result = []
    for record in atomic.read(folder, "forbidden-lines.csv"):
        species, vacuum = record["species"] + " " + record["ion"], float(record["wavelength_vac_angstrom"])
        # The levels give the wavelength with a digit more than the table prints.
        ritz = 1e8 / (float(record["e_upper_cm1"]) - float(record["e_lower_cm1"]))
        air = atomic.air_ciddor(ritz if abs(ritz - vacuum) < 0.01 else vacuum)
        if not BLUE < air < RED or (species, int(air)) in FAINT:
            continue
        parts = [r for r in rows if r.species == species and r.forbidden and abs(r.vacuum - vacuum) < 0.1
                 and abs(r.lower - float(record["e_lower_cm1"])) < 0.5 and not math.isnan(r.a_ki)]
        a_ki = sum(r.a_ki for r in parts) if parts else math.nan
        result.append(line(species, air, "NIST ASD levels" + (", A of NIST ASD" if parts else ""), "forbidden",
                           float(record["e_lower_cm1"]) / atomic.CM1_PER_EV, a_ki=a_ki))
    return result


def hydrogen(folder):
    result = []
    for entry in balmer.lines(folder):
        if entry["line"] in CASE_B or entry["line"] in ("Pa9", "Pa10", "Pa11", "Pa12"):
            entry["intensity"] = CASE_B.get(entry["line"], math.nan)
            if entry["line"] in CASE_B:
                entry["source"] += "; intensity: case B (Osterbrock and Ferland 2006, from memory)"
            result.append(entry)
    return result


def helium(folder, rows):
    result = []
    for air in HELIUM:
        near = [r for r in rows if r.species == "He I" and not r.forbidden and abs(r.air - air) < MERGE and not math.isnan(r.log_gf)]
        strongest = max(near, key=lambda r: r.log_gf)
        parts = [r for r in near if r.multiplet == strongest.multiplet]
        result.append(line("He I", atomic.air_ciddor(atomic.centroid(parts)), atomic.merged_source(parts), "", strongest.lower / atomic.CM1_PER_EV, atomic.add_gf(parts)))
    for record in atomic.read(folder, "he2-hydrogenic-lines.csv"):
        if (record["n_lower"], record["n_upper"]) in (("3", "4"), ("4", "7")):
            result.append(line("He II", atomic.air_ciddor(float(record["wavelength_vac_angstrom"])), "centroid of NIST ASD levels, g f hydrogenic", "",
                               float(record["e_lower_cm1"]) / atomic.CM1_PER_EV, float(record["log_gf"]), float(record["aki_per_s"])))
    return result


METADATA = {
    "title": "Emission lines of nebulae",
    "medium": "air",
    "source": "NIST Atomic Spectra Database: forbidden lines from the levels of ground configurations, hydrogen and helium from lines; "
              "wavelengths brought to standard air by Ciddor (1996)",
    "citation": atomic.CITATION,
    "intensity": "relative to H-beta = 100, where known",
}
