#!/usr/bin/env bash
# Makes the table of melt onset and freeze-up of docs/METHODS.md: dates in an invented northern sea against its truth. Some minutes.
# Usage: scripts/score-melt.sh
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT

score() { # what, then arguments
  echo "== $1"
  shift
  "$root/scripts/iceextent" scene --score --melt-season --sensor ssmi-f13 --methods nasa-team "$@"
}

score "north, ice years 2002 to 2004" --from 2002-03-01 --to 2004-12-31
printf '[melt]\nhorizontal_range_lead_days = 0\n' > "$work/remembered.toml"
score "north, ice year 2003, the test as remembered of its source" --from 2003-03-01 --to 2003-12-31 --settings "$work/remembered.toml"

# Mild days make dry ice wetter, and wet snow looks as in the other scores.
sed -e 's/^early_melt_share = 0.1 /early_melt_share = 0.3 /' "$root/config/scenes/north.toml" > "$work/early.toml"
score "north, ice year 2003, three times as much early melt" --from 2003-03-01 --to 2003-12-31 --scene "$work/early.toml"
sed -e '/^\[melt_season.wet_ice_emissivity\]/,/^\[/ { s/^19h = .*/19h = 0.925/; s/^37h = .*/37h = 0.930/ }' "$root/config/scenes/north.toml" > "$work/weak.toml"
score "north, ice year 2003, wet snow as in the other scores" --from 2003-03-01 --to 2003-12-31 --scene "$work/weak.toml"
sed -e 's/^day_step = 1/day_step = 2/' "$root/config/scenes/north.toml" > "$work/alternate.toml"
score "north, ice year 2003, measured every other day" --from 2003-03-01 --to 2003-12-31 --scene "$work/alternate.toml"
score "south, ice year 2003" --grid south-25km --from 2003-01-01 --to 2003-12-31
