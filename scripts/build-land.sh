#!/usr/bin/env bash
# Writes config/land/*.nc, the land file of every grid in config/grids (or of the grid files given as arguments).
#
# Needs: dotnet, npm (for the outlines of land), apt-get and dpkg-deb (Debian; for the ice shelves of Antarctica).
# Takes:  npm package world-atlas 2.0.2, land-50m.json: Natural Earth 1:50m land, public domain.
#         Debian package gmt-gshhg-low, binned_GSHHS_i.nc: GSHHG 2.3.7, LGPL 3 or later.
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
if [ $# -gt 0 ]; then
  grids=()
  for grid in "$@"; do grids+=("$(realpath "$grid")"); done
else
  grids=("$root"/config/grids/*.toml)
fi

work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
chmod 755 "$work"
cd "$work"
npm pack --silent world-atlas@2.0.2 >/dev/null
echo "032e7765f2ce00edaeafec23ff22bc3b77e42987c257da944cc585b452c05b97  world-atlas-2.0.2.tgz" | sha256sum --check --quiet
tar xzf world-atlas-2.0.2.tgz package/land-50m.json
apt-get download gmt-gshhg-low >/dev/null 2>&1
dpkg-deb -x gmt-gshhg-low_*.deb gshhg
fronts=gshhg/usr/share/gmt-gshhg/binned_GSHHS_i.nc
echo "96ee672a0fd5b80ad2919127855238169a90b9fea0ccded54ae76689dfaf3f2b  $fronts" | sha256sum --check --quiet

dotnet run --project "$root/scripts/LandBuilder" --configuration Release -- package/land-50m.json "$fronts" "${grids[@]}"
