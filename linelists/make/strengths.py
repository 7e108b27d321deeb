"""How strong each line of the NIST table would be in the light of the Sun, to judge blends. Never printed."""
import bisect
import math
import atomic

TEMPERATURE = 5800.0          # K
LOG_ELECTRON_PRESSURE = 1.3   # dyn/cm2, where lines of the solar photosphere form; common practice, no source
KT_EV = 8.617333262e-5 * TEMPERATURE

# Abundances of the solar photosphere, log N(H) = 12, after Asplund et al. (2009); from memory, good enough to judge blends.
ABUNDANCE = {
    "H": 12.0, "He": 10.93, "Li": 1.05, "C": 8.43, "N": 7.83, "O": 8.69, "Ne": 7.93, "Na": 6.24, "Mg": 7.60, "Al": 6.45, "Si": 7.51,
    "P": 5.41, "S": 7.12, "K": 5.03, "Ca": 6.34, "Sc": 3.15, "Ti": 4.95, "V": 3.93, "Cr": 5.64, "Mn": 5.43, "Fe": 7.50, "Co": 4.99,
    "Ni": 6.22, "Cu": 4.19, "Zn": 4.56, "Sr": 2.87, "Y": 2.21, "Zr": 2.58, "Nb": 1.46, "Mo": 1.88, "Ru": 1.75, "Ba": 2.18, "La": 1.10,
    "Ce": 1.58, "Pr": 0.72, "Nd": 1.42, "Sm": 0.96, "Eu": 0.52, "Gd": 1.07, "Dy": 1.10, "Er": 0.92, "Hf": 0.85,
}
STAGES = ("I", "II", "III")


class Strengths:
    """Logarithm of N(lower level) g f lambda for every row that allows it, and the sums of neighbours."""

    def __init__(self, folder, rows):
        partitions = self._partitions(folder)
        energies = {(r["symbol"], r["ion"]): float(r["ionisation_energy_ev"]) for r in atomic.read(folder, "ionisation-energies.csv") if r["ionisation_energy_ev"]}
        self._populations = {e: self._stages(e, partitions, energies) for e in ABUNDANCE}
        self._rows = [r for r in rows if not math.isnan(self.of(r))]
        self._wavelengths = [r.vacuum for r in self._rows]
        self._unknown = [r for r in rows if math.isnan(r.log_gf) and r.intensity == r.intensity and not r.forbidden]
        self._unknown_wavelengths = [r.vacuum for r in self._unknown]

    def of(self, row):
        stage = self._populations.get(row.element, {}).get(row.ion)
        if stage is None or math.isnan(row.log_gf) or math.isnan(row.lower) or row.forbidden:
            return math.nan
        return stage + row.log_gf - row.lower / atomic.CM1_PER_EV / KT_EV * math.log10(math.e) + math.log10(row.vacuum)

    def neighbours(self, row, reach):
        """Summed strength of the other rows within a distance, in units of the row's own."""
        first = bisect.bisect_left(self._wavelengths, row.vacuum - reach)
        last = bisect.bisect_right(self._wavelengths, row.vacuum + reach)
        own = self.of(row)
        return sum(10.0 ** (self.of(r) - own) for r in self._rows[first:last] if r is not row)

    def hidden(self, row, reach):
        """True where a row of the same spectrum without g f stands close and is as bright in the laboratory."""
        first = bisect.bisect_left(self._unknown_wavelengths, row.vacuum - reach)
        last = bisect.bisect_right(self._unknown_wavelengths, row.vacuum + reach)
        return any(r.species == row.species and not r.intensity < 0.3 * row.intensity for r in self._unknown[first:last])

    @staticmethod
    def _partitions(folder):
        """Partition functions at the temperature, linear in its logarithm."""
        below, above = {}, {}
        for record in atomic.read(folder, "partition-functions.csv"):
            key, t, u = (record["symbol"], record["ion"]), float(record["temperature_k"]), float(record["partition_function"])
            if t <= TEMPERATURE:
                below[key] = (t, u)
            elif key not in above:
                above[key] = (t, u)
        result = {}
        for key, (t0, u0) in below.items():
            t1, u1 = above.get(key, (2.0 * t0, u0))
            result[key] = u0 + (u1 - u0) * math.log(TEMPERATURE / t0) / math.log(t1 / t0)
        return result

    @staticmethod
    def _stages(element, partitions, energies):
        """log of abundance times the share of each stage over its partition function, by Saha's equation."""
        shares, log_share = {"I": 0.0}, 0.0
        for low, high in zip(STAGES, STAGES[1:]):
            if (element, high) not in partitions or (element, low) not in energies:
                break
            log_share += (-0.1761 - LOG_ELECTRON_PRESSURE + math.log10(partitions[element, high] / partitions[element, low])
                          + 2.5 * math.log10(TEMPERATURE) - energies[element, low] / KT_EV * math.log10(math.e))
            shares[high] = log_share
        whole = math.log10(sum(10.0 ** s for s in shares.values()))
        return {ion: ABUNDANCE[element] + s - whole - math.log10(partitions[element, ion])
                for ion, s in shares.items() if (element, ion) in partitions}
