#!/usr/bin/env bash
# The main job on the invented night: what a file holds, then lines, velocities, normalized spectra and figures of all.
# Usage: examples/run-night.sh [FOLDER]     (results go to FOLDER; default: out/night)
set -eu
top=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
out=${1:-$top/out/night}
mkdir -p "$out"
cd "$top"
export DOTNET_NOLOGO=1 DOTNET_CLI_TELEMETRY_OPTOUT=1
dotnet build src/StarLines.Cli -c Release -v quiet --nologo -clp:"ErrorsOnly;NoSummary"
starlines() { dotnet src/StarLines.Cli/bin/Release/net10.0/starlines.dll "$@"; }

starlines inspect examples/night/wren-47.fits
starlines run examples/night --out "$out"
starlines plot examples/night/wren-47.fits --lines metals-fgk --lines balmer --range 5150:5460 --out "$out/wren-47.png"

echo
echo "Radial velocities, km/s, by the metal lines (of the A star by hydrogen), a row a star:"
grep -v '^#' "$out/velocities.ecsv" | awk -F, 'NR == 1 { for (i = 1; i <= NF; i++) column[$i] = i; next }
    $column["rv"] != "" && $column["template"] == ($column["target"] == "Wren 12" ? "balmer" : "metal") && !seen[$column["target"] $column["component"]]++ { printf "  %-8s %8.2f ± %.2f  %s\n", $column["target"], $column["rv"], $column["rv_err"], $column["status"] }'
echo "Everything is in $out."
