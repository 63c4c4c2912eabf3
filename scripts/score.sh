#!/usr/bin/env bash
# Makes the score tables and drifts of docs/METHODS.md: methods on an invented northern sea against its truth. About 15 minutes on two cores.
# Usage: scripts/score.sh [FOLDER]   (default artifacts/score; the folder keeps three years of invented days, about 2 GB with their grids)
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
folder=${1:-"$root/artifacts/score"}
program="$root/scripts/iceextent"
mkdir -p "$folder"
folder=$(cd "$folder" && pwd)

printf '[weather]\nlimits = "retuned"\n[coast]\ncorrection = "brightness"\n' > "$folder/record.toml"
printf '[coast]\ncorrection = "brightness"\n' > "$folder/fixed.toml"
printf '[weather]\nlimits = "retuned"\nice_mask_file = "mask.nc"\n[coast]\ncorrection = "brightness"\n' > "$folder/masked.toml"
{ cat "$folder/masked.toml"; printf '[tie_points]\nmoving = true\n'; } > "$folder/moving.toml"

if [ ! -f "$folder/mask.nc" ]; then # Where ice can be, from three years of self-tuning.
  "$program" scene --sensor ssmi-f13 --from 2001-01-01 --to 2003-12-31 --no-truth --out "$folder/three-years"
  sed -i 's/^methods .*/methods = ["self-tuning"]/' "$folder/three-years/run.toml"
  cat "$folder/record.toml" >> "$folder/three-years/run.toml"
  "$program" run "$folder/three-years/run.toml"
  "$program" ice-mask "$folder/three-years/run.toml" --out "$folder/mask.nc"
fi

score() { # settings, then methods
  local settings=$1
  shift
  "$program" scene --score --sensor ssmi-f13 --from 2003-01-01 --to 2003-12-31 --every 4 --settings "$folder/$settings.toml" --methods "$@"
}

echo "== 2003, fixed limits and tie points"
score fixed nasa-team bootstrap bristol self-tuning
echo "== 2003, retuned limits and the mask"
score masked nasa-team bootstrap bristol self-tuning
echo "== 2003, the same with tie points that move"
score moving nasa-team bootstrap bristol
echo "== 2000 to 2004, self-tuning, retuned limits and the mask"
"$program" scene --score --sensor ssmi-f13 --from 2000-01-01 --to 2004-12-31 --every 5 --settings "$folder/masked.toml" --methods self-tuning

# A successor with offsets of 2 K, and a drift of 0.5 K per decade in both: of one sign, and of two.
instrument() { # file, offset and drift of 19 and 22 GHz, of 37 GHz
  sed -e "s/^\[instrument.offset_kelvins\]/&\n19v = $2\n19h = $2\n22v = $2\n37v = $4\n37h = $4/" \
    -e "s/^\[instrument.drift_kelvins_per_decade\]/&\n19v = $3\n19h = $3\n22v = $3\n37v = $5\n37h = $5/" "$root/config/scenes/north.toml" > "$folder/$1.toml"
}
instrument even-first 0.0 0.5 0.0 0.5
instrument even-next 2.0 0.5 2.0 0.5
instrument odd-first 0.0 0.5 0.0 -0.5
instrument odd-next 2.0 0.5 -2.0 -0.5
drift() { # settings, first scene, next scene, methods
  local settings=$1 first=$2 next=$3
  shift 3
  "$program" scene --score --sensor ssmi-f13 --scene "$first" --successor "$next" --change-over 2002-01-01 --from 1996-01-10 --to 2007-12-31 --every 61 \
    --settings "$folder/$settings.toml" --methods "$@" | sed -n '/^Drift/,$p'
}
for instruments in "north north" "$folder/even-first.toml $folder/even-next.toml" "$folder/odd-first.toml $folder/odd-next.toml"; do
  read -r first next <<<"$instruments"
  echo "== 1996 to 2007, $(basename "$first" .toml), then $(basename "$next" .toml)"
  drift fixed "$first" "$next" nasa-team bootstrap bristol
  drift record "$first" "$next" self-tuning
done
