"""Lines and the ECSV files that hold them."""
import math
import os

COLUMNS = [
    ("line", "string", "", "", "Name of the line"),
    ("species", "string", "", "", "Atom or ion"),
    ("wavelength", "float64", "Angstrom", "{:.5f}", "Wavelength in standard air"),
    ("lower_energy", "float64", "eV", "{:.4f}", "Excitation energy of the lower level"),
    ("log_gf", "float64", "", "{:.3f}", "Decimal logarithm of the weighted oscillator strength g f"),
    ("a_ki", "float64", "1/s", "{:.3e}", "Einstein coefficient of spontaneous emission"),
    ("intensity", "float64", "", "{:.4g}", "Relative intensity in emission"),
    ("source", "string", "", "", "Where the numbers come from"),
]


def line(species, air, source, name="", lower_energy=math.nan, log_gf=math.nan, a_ki=math.nan, intensity=math.nan):
    label = "[" + species + "]" if name == "forbidden" else species
    return {
        "line": f"{label} {air:.2f}" if name in ("", "forbidden") else name,
        "species": species, "wavelength": air, "lower_energy": lower_energy,
        "log_gf": log_gf, "a_ki": a_ki, "intensity": intensity, "source": source,
    }


def quoted(text):
    return '"' + text.replace("\\", "\\\\").replace('"', '\\"') + '"'


def cell(value, form):
    if isinstance(value, str):
        return '"' + value.replace('"', '""') + '"' if any(c in value for c in ',"#') else value
    return "" if math.isnan(value) else form.format(value)


def write(folder, name, lines, metadata):
    """Writes linelists/NAME.ecsv, leaving out columns without any value."""
    lines = sorted(lines, key=lambda entry: entry["wavelength"])
    columns = [c for c in COLUMNS if any(isinstance(e[c[0]], str) or not math.isnan(e[c[0]]) for e in lines)]
    out = ["# %ECSV 1.0", "# ---", "# datatype:"]
    for key, kind, unit, _, description in columns:
        out.append(f"# - {{name: {key}, " + (f"unit: {unit}, " if unit else "") + f"datatype: {kind}, description: {quoted(description)}}}")
    out += ["# delimiter: ','", "# meta: !!omap"]
    out += [f"# - {{{key}: {quoted(value)}}}" for key, value in metadata.items()]
    out += ["# schema: astropy-2.0", ",".join(c[0] for c in columns)]
    out += [",".join(cell(entry[c[0]], c[3]) for c in columns) for entry in lines]
    with open(os.path.join(folder, name + ".ecsv"), "w", encoding="utf-8", newline="\n") as stream:
        stream.write("\n".join(out) + "\n")
    print(f"{name}: {len(lines)} lines")
