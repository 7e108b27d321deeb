#!/usr/bin/env bash
# The main job on the invented night: what the files hold, lines, velocities, normalized spectra and figures.
# Usage: examples/run-night.sh [FOLDER]     (results go to FOLDER; default: out/night)
set -eu
top=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
out=${1:-$top/out/night}
mkdir -p "$out"
cd "$top"
export DOTNET_NOLOGO=1 DOTNET_CLI_TELEMETRY_OPTOUT=1
dotnet build src/StarLines.Cli -c Release -v quiet -clp:'ErrorsOnly;NoSummary'
starlines() { dotnet src/StarLines.Cli/bin/Release/net10.0/starlines.dll "$@"; }

starlines inspect examples/night/wren-47.fits
starlines velocity examples/night/*.fits --out "$out/velocities.ecsv" --plot "$out/correlation.png"
starlines measure examples/night/*.fits --lines metals-fgk --lines balmer --out "$out/lines.ecsv"
starlines normalize examples/night/*.fits --out "$out"
starlines plot examples/night/wren-47.fits --lines metals-fgk --lines balmer --range 5150:5460 --out "$out/wren-47.png"
starlines plot examples/night/wren-90.fits --kind spectrum --out "$out/wren-90.png"
starlines plot examples/night/wren-76.fits --kind lines --lines metals-fgk --range 5300:5460 --out "$out/wren-76-lines.png"

echo
echo "Radial velocities, km/s, by the metal lines (none is found in the A star, whose hydrogen lines are in the table):"
grep -v '^#' "$out/velocities.ecsv" | awk -F, 'NR == 1 { for (i = 1; i <= NF; i++) column[$i] = i; next }
    $column["template"] == "metal" && $column["rv"] != "" { printf "  %-8s %8.2f ± %.2f  %s\n", $column["target"], $column["rv"], $column["rv_err"], $column["status"] }'
echo "Everything is in $out."
