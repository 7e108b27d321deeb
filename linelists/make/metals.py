"""Clean metal lines of F, G and K stars."""
import math
import atomic
from listfile import line
from strengths import Strengths

SPECIES = ("Fe I", "Fe II", "Ca I", "Ca II", "Mg I", "Ti I", "Ti II", "Cr I", "Cr II", "Ni I", "Si I", "Si II", "Na I")
BLUE, RED = 3900.0, 9000.0
REACH = 0.15          # angstrom within which a neighbour counts
NEIGHBOURS = 0.12     # of the line's strength that all neighbours may have together
AGREEMENT = 0.01      # angstrom between observed and Ritz wavelength
PER_STEP = 9          # lines taken from each 100 angstrom, the strongest first
WEAKEST = 2.6         # dex below the hundredth strongest line of the pool; set by eye, not calibrated against widths
LOG_GF_OF_WIDTHS = "log gf of the paper"

# Wings of hydrogen and Ca II H and K, the CH band, and bands of telluric oxygen and water.
AVOID = ((3920.0, 3945.0), (3958.0, 3982.0), (4095.0, 4108.0), (4285.0, 4316.0), (4334.0, 4347.0), (4855.0, 4868.0), (6555.0, 6571.0),
         (6865.0, 6945.0), (7160.0, 7340.0), (7590.0, 7710.0), (8120.0, 8360.0), (8490.0, 8506.0), (8534.0, 8550.0), (8654.0, 8670.0))
NAMED = {
    ("Ca II", 3933.66): "Ca II K", ("Ca II", 3968.47): "Ca II H", ("Na I", 5889.95): "Na I D2", ("Na I", 5895.92): "Na I D1",
    ("Mg I", 5183.60): "Mg I b1", ("Mg I", 5172.68): "Mg I b2", ("Mg I", 5167.32): "Mg I b4", ("Ca I", 4226.73): "",
    ("Ca II", 8498.02): "", ("Ca II", 8542.09): "", ("Ca II", 8662.14): "", ("Fe I", 5269.54): "", ("Fe I", 4383.54): "", ("Fe I", 4045.81): "",
    ("Fe I", 5328.04): "", ("Fe I", 6065.48): "", ("Fe II", 5169.03): "", ("Fe II", 4923.92): "", ("Fe II", 5018.44): "",
    ("Si II", 6347.10): "", ("Si II", 6371.36): "", ("Ti II", 4443.80): "", ("Ti II", 4468.49): "",
}


def lines(folder):
    rows = atomic.nist_rows(folder)
    strengths = Strengths(folder, rows)
    pool = [r for r in rows if r.species in SPECIES and not math.isnan(strengths.of(r)) and BLUE < r.air < RED]
    named = {id(r): name for r, name in find_named(pool, strengths)}
    widths = find_widths(folder, rows)
    chosen = {id(r): r for r in pool if id(r) in named}
    taken = chosen | {id(r): r for r, _ in widths if r is not None}
    for row in best_of_steps(pool, strengths, taken.values()):
        chosen[id(row)] = row
    result = [make(r, r.air, r.log_gf, atomic.NIST, named.get(id(r), "")) for r in chosen.values()]
    for row, record in widths:
        if row is None or id(row) not in chosen:
            result.append(make_width(row, record))
        else:
            entry = next(e for e in result if e["species"] == row.species and abs(e["wavelength"] - row.air) < 1e-6)
            entry["source"] += "; solar width in " + paper(record)
    return result


def find_named(pool, strengths):
    for (species, air), name in NAMED.items():
        near = [r for r in pool if r.species == species and abs(r.air - air) < 0.03]
        yield max(near, key=strengths.of), name


def find_widths(folder, rows):
    """The lines of the published solar widths, each with its NIST row where there is one."""
    found, seen = [], []
    for record in atomic.read(folder, "solar-equivalent-widths.csv"):
        species, air = record["species"] + " " + record["ion"], float(record["wavelength_air_angstrom"])
        if species not in SPECIES or not BLUE < air < RED or record["hyperfine_components_following"] not in ("", "0"):
            continue
        if any(species == s and abs(air - a) < 0.1 for s, a in seen):
            # The second paper measured many lines of the first again.
            continue
        seen.append((species, air))
        energy = float(record["excitation_potential_ev"]) * atomic.CM1_PER_EV
        near = [r for r in rows if r.species == species and abs(r.air - air) < 0.03 and abs(r.lower - energy) < 80.0 and not r.forbidden]
        if not near and len(record["wavelength_air_angstrom"].split(".")[1]) < 3:
            # Two decimals are not enough to measure a velocity by.
            continue
        found.append((min(near, key=lambda r: abs(r.air - air)) if near else None, record))
    return found


def best_of_steps(pool, strengths, taken):
    """The strongest clean lines of each 100 angstrom, well apart from each other and from those taken already."""
    reference = sorted((strengths.of(r) for r in pool), reverse=True)[100]
    clean = [r for r in pool if r.agreement < AGREEMENT and r.observed_error < 0.01 and strengths.of(r) > reference - WEAKEST
             and not any(a < r.air < b for a, b in AVOID)
             and strengths.neighbours(r, REACH) < NEIGHBOURS and not strengths.hidden(r, 0.07)]
    kept = list(taken)
    for start in range(int(BLUE), int(RED), 100):
        here = sorted((r for r in clean if start <= r.air < start + 100), key=strengths.of, reverse=True)
        count = sum(start <= r.air < start + 100 for r in kept)
        for row in here:
            if count >= PER_STEP:
                break
            if all(abs(row.air - other.air) > 2.0 * REACH for other in kept):
                kept.append(row)
                count += 1
                yield row


def paper(record):
    return " ".join(record["source"].replace(" ApJ", ", ApJ").split(" table")[0].split())


def make(row, air, log_gf, source, name=""):
    return line(row.species, air, source, name, row.lower / atomic.CM1_PER_EV, log_gf, row.a_ki)


def make_width(row, record):
    species = record["species"] + " " + record["ion"]
    if row is None:
        # Printed in air with three decimals by the paper.
        return line(species, float(record["wavelength_air_angstrom"]), paper(record), "", float(record["excitation_potential_ev"]), float(record["log_gf"]))
    # Where the two disagree, the Sun tells which of observed and Ritz wavelength is right.
    solar = float(record["wavelength_air_angstrom"])
    candidates = [row.air] if row.agreement < AGREEMENT else [atomic.air_ciddor(w) for w in (row.observed, row.ritz) if not math.isnan(w)]
    air = min(candidates, key=lambda w: abs(w - solar))
    if math.isnan(row.log_gf):
        return make(row, air, float(record["log_gf"]), f"{atomic.NIST}; {LOG_GF_OF_WIDTHS}: {paper(record)}")
    return make(row, air, row.log_gf, f"{atomic.NIST}; solar width in {paper(record)}")


METADATA = {
    "title": "Clean metal lines of F, G and K stars",
    "medium": "air",
    "source": "NIST Atomic Spectra Database, and lines with published solar widths; wavelengths brought to standard air by Ciddor (1996)",
    "citation": atomic.CITATION + "; Bedell et al. (2017), ApJ 839, 94, table 3; Bedell et al. (2018), ApJ 865, 68",
    "selection": "The strongest lines of each 100 angstrom whose neighbours within 0.15 angstrom have together less than 12 % of their strength "
                 "at 5800 K, observed and Ritz wavelengths within 0.01 angstrom, outside the wings of hydrogen and Ca II H and K, the CH band "
                 "at 4300 and strong telluric bands; besides them the lines of published solar widths and well-known strong lines",
}
