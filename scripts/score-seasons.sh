#!/usr/bin/env bash
# Holds season dates against the truth of invented scenes: the tables of docs/METHODS.md. Takes some ten minutes.
set -euo pipefail
cd "$(dirname "$0")/.."
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cat > "$work/settings.toml" <<'T'
regions = ["northern-seas"]
[weather]
limits = "retuned"
[coast]
correction = "brightness"
T
sed 's/^highest_pond_share.*/highest_pond_share = 0.0/' config/scenes/north.toml > "$work/without-ponds.toml"
for scene in "$work/without-ponds.toml" north; do
  echo "== $(basename "$scene" .toml)"
  scripts/iceextent scene --score --seasons --scene "$scene" --sensor ssmi-f13 --methods self-tuning nasa-team \
    --from 2000-03-01 --to 2002-03-01 --settings "$work/settings.toml" "$@"
done
