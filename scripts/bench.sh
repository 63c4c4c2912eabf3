#!/usr/bin/env bash
# Times whole runs on a year of daily files next to the time needed only to read and inflate the same bytes.
# Usage: scripts/bench.sh [ROUNDS] [FOLDER]   (default 5 rounds; the folder keeps the input, about 260 MB, for the next time)
# With TEN_YEARS=1 in the environment it also runs 3,660 days once, to hold peak memory against the number of days.
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
rounds=${1:-5}
folder=${2:-"$root/artifacts/bench"}
workers=$(nproc)
program="$root/scripts/iceextent"
"$program" --version >/dev/null
dotnet build "$root/tests/IceExtent.Benchmarks" -c Release -v quiet -clp:NoSummary -p:RunAnalyzers=false
bench="$root/tests/IceExtent.Benchmarks/bin/Release/net10.0/IceExtent.Benchmarks.dll"

if [ ! -f "$folder/run.toml" ]; then
  mkdir -p "$folder"
  "$program" scene --grid north-25km --sensor ssmis-f17 --from 2020-01-01 --to 2020-12-31 --no-truth --out "$folder" >&2
fi
days=$(ls "$folder/brightness" | wc -l)
sed 's/^output .*/output = "with-grids"/' "$folder/run.toml" > "$folder/with-grids.toml"
sed 's/^output .*/output = "no-grids"\nwrite_grids = false/' "$folder/run.toml" > "$folder/no-grids.toml"

# Three methods on tie points that move: every day is read twice.
sed -e 's/^output .*/output = "three-methods"\nwrite_grids = false/' -e 's/^methods .*/methods = ["nasa-team", "bootstrap", "self-tuning"]/' \
  -e 's/^\[\[source\]\]/[tie_points]\nmoving = true\n\n[[source]]/' "$folder/run.toml" > "$folder/three-methods.toml"

seconds() { # wall seconds and peak memory in MB of one command
  /usr/bin/time -f '%e %M' -o "$folder/time" "$@" >/dev/null 2>"$folder/messages" || { cat "$folder/messages" >&2; exit 1; }
  awk '{printf "%s %d\n", $1, $2 / 1024}' "$folder/time"
}

: > "$folder/rounds.txt"
for round in $(seq "$rounds"); do # Interleaved, so that a slow minute of the machine meets all four.
  rm -rf "$folder/with-grids" "$folder/no-grids" "$folder/three-methods"
  inflate=$(dotnet "$bench" inflate "$folder/brightness" tb_19v tb_19h tb_22v tb_37v tb_37h --workers "$workers" | awk '{print $1}')
  read -r grids gridsMemory <<<"$(seconds "$program" run "$folder/with-grids.toml" --workers "$workers")"
  read -r plain plainMemory <<<"$(seconds "$program" run "$folder/no-grids.toml" --workers "$workers")"
  read -r three threeMemory <<<"$(seconds "$program" run "$folder/three-methods.toml" --workers "$workers")"
  echo "$inflate $grids $gridsMemory $plain $plainMemory $three $threeMemory" >> "$folder/rounds.txt"
  echo "round $round: inflate only $inflate s, with grids $grids s ($gridsMemory MB), without $plain s ($plainMemory MB), three methods $three s ($threeMemory MB)" >&2
done

median() { awk -v c="$1" '{print $c}' "$folder/rounds.txt" | sort -g | awk '{v[NR] = $1} END {print NR % 2 ? v[(NR + 1) / 2] : (v[NR / 2] + v[NR / 2 + 1]) / 2}'; }
echo
echo "$days days, 5 channels, 304 x 448, $workers workers, median of $rounds rounds"
printf '%-28s %8s %10s %8s\n' what seconds days/s peak_MB
printf '%-28s %8.2f %10.0f %8s\n' "read and inflate only" "$(median 1)" "$(awk -v d="$days" -v s="$(median 1)" 'BEGIN {print d / s}')" -
printf '%-28s %8.2f %10.0f %8.0f\n' "run, grids written" "$(median 2)" "$(awk -v d="$days" -v s="$(median 2)" 'BEGIN {print d / s}')" "$(median 3)"
printf '%-28s %8.2f %10.0f %8.0f\n' "run, tables only" "$(median 4)" "$(awk -v d="$days" -v s="$(median 4)" 'BEGIN {print d / s}')" "$(median 5)"
printf '%-28s %8.2f %10.0f %8.0f\n' "three methods, moving points" "$(median 6)" "$(awk -v d="$days" -v s="$(median 6)" 'BEGIN {print d / s}')" "$(median 7)"
awk -v p="$(median 4)" -v t="$(median 6)" 'BEGIN {printf "three methods with moving tie points: %.2f of the days per second of one with fixed ones\n", p / t}'
awk -v i="$(median 1)" -v g="$(median 2)" -v p="$(median 4)" 'BEGIN {printf "time over inflating alone: %.1f with grids, %.1f without\n", g / i, p / i}'

if [ "${TEN_YEARS:-0}" = 1 ]; then
  long="$folder/ten-years"
  [ -f "$long/run.toml" ] || "$program" scene --grid north-25km --sensor ssmis-f17 --from 2010-01-01 --to 2020-01-08 --no-truth --out "$long" >&2
  rm -rf "$long/archive"
  read -r longSeconds longMemory <<<"$(seconds "$program" run "$long/run.toml" --workers "$workers")"
  echo "$(ls "$long/brightness" | wc -l) days, grids written: $longSeconds s, peak $longMemory MB"
fi
