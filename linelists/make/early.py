"""Lines of O, B and A stars."""
import math
import atomic
from listfile import line

BLUE, RED = 3800.0, 9000.0
MERGE = 0.25   # angstrom within which the components of a multiplet are one line in any star of this kind
APART = 0.4    # angstrom between lines of one species

# Lines to take of each ion, the strongest first, and the temperature in K at which that is judged.
WANTED = {
    "He I": (24, 20000.0), "C II": (14, 20000.0), "C III": (9, 30000.0), "N II": (24, 22000.0), "N III": (10, 32000.0), "O II": (40, 25000.0),
    "Ne I": (12, 18000.0), "Mg II": (10, 12000.0), "Al II": (5, 14000.0), "Al III": (6, 24000.0), "Si II": (12, 13000.0), "Si III": (12, 24000.0),
    "Si IV": (6, 30000.0), "S II": (14, 16000.0), "Fe III": (10, 22000.0), "O I": (8, 10000.0),
}
LAST_HELIUM2 = 14


def lines(folder):
    rows = [r for r in atomic.nist_rows(folder) if r.species in WANTED and BLUE < r.air < RED and not r.forbidden
            and not math.isnan(r.log_gf) and not math.isnan(r.lower)]
    result = []
    for species, (count, temperature) in WANTED.items():
        blends = merged([r for r in rows if r.species == species])
        blends.sort(key=lambda parts: strength(parts, temperature), reverse=True)
        kept = []
        for parts in blends:
            air = atomic.air_ciddor(atomic.centroid(parts))
            if len(kept) < count and all(abs(air - other["wavelength"]) > APART for other in kept):
                kept.append(make(parts, air))
        result += kept
    return result + helium2(folder)


def strength(parts, temperature):
    return atomic.add_gf(parts) - parts[0].lower / atomic.CM1_PER_EV / (8.617333262e-5 * temperature) * math.log10(math.e)


def merged(rows):
    """Components of one multiplet close to its strongest, each group one line; satellites farther off stand alone."""
    groups, used = [], set()
    for row in sorted(rows, key=lambda r: -r.log_gf):
        if id(row) in used:
            continue
        parts = [r for r in rows if id(r) not in used and r.multiplet == row.multiplet and abs(r.vacuum - row.vacuum) < MERGE]
        used.update(id(r) for r in parts)
        groups.append(parts)
    return groups


def make(parts, air):
    strongest = max(parts, key=lambda r: r.log_gf)
    a_ki = strongest.a_ki if len(parts) == 1 else math.nan
    return line(strongest.species, air, atomic.merged_source(parts), "", strongest.lower / atomic.CM1_PER_EV, atomic.add_gf(parts), a_ki)


def helium2(folder):
    """The Fowler and Pickering series up to n = 14."""
    result = []
    for record in atomic.read(folder, "he2-hydrogenic-lines.csv"):
        air = atomic.air_ciddor(float(record["wavelength_vac_angstrom"]))
        if BLUE < air < RED and int(record["n_lower"]) < 5 and int(record["n_upper"]) <= LAST_HELIUM2:
            result.append(line("He II", air, "centroid of NIST ASD levels, g f hydrogenic", "", float(record["e_lower_cm1"]) / atomic.CM1_PER_EV,
                               float(record["log_gf"]), float(record["aki_per_s"])))
    return result


METADATA = {
    "title": "Lines of O, B and A stars",
    "medium": "air",
    "source": "NIST Atomic Spectra Database; wavelengths brought to standard air by Ciddor (1996)",
    "citation": atomic.CITATION,
    "selection": "The strongest lines of each ion; components of a multiplet within 0.25 angstrom of the strongest are one line, "
                 "its wavelength weighted by g f and its g f the sum; weaker satellites farther off are left out or stand as lines of their own",
}
