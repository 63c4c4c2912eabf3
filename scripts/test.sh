#!/usr/bin/env bash
# Builds everything with all checks on and runs every test. Ends with "N passed, N failed".
set -uo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
cd "$root"

# Programs that read our files independently of us; the tests that use them fail where they are missing.
packages=(netcdf-bin python3-numpy python3-netcdf4 python3-xarray gdal-bin cdo)
missing=()
for package in "${packages[@]}"; do
  dpkg -s "$package" >/dev/null 2>&1 || missing+=("$package")
done
if [ ${#missing[@]} -gt 0 ]; then
  echo "Installing from Debian: ${missing[*]}"
  if [ "$(id -u)" -eq 0 ]; then sudo=(); else sudo=(sudo); fi
  if ! { "${sudo[@]}" apt-get update -qq && "${sudo[@]}" env DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends "${missing[@]}"; } >/dev/null; then
    echo "Could not install: ${missing[*]}. Install them by hand; the tests that read files with them will fail." >&2
  fi
fi

if ! dotnet build IceExtent.sln -c Release -v quiet -clp:NoSummary; then
  echo "0 passed, 1 failed"
  exit 1
fi

results="$root/TestResults"
rm -rf "$results"
dotnet test IceExtent.sln -c Release --no-build -v quiet --results-directory "$results" --logger "trx" || true

count() { # the sum of one counter over all result files
  cat "$results"/*.trx 2>/dev/null | grep -o '<Counters [^>]*' | grep -o " $1=\"[0-9]*\"" | grep -o '[0-9]*' | awk '{sum += $1} END {print sum + 0}'
}
total=$(count total)
passed=$(count passed)
failed=$((total - passed)) # A test that was not run did not pass.
projects=$(ls tests/*.Tests/*.csproj | wc -l)
files=$(ls "$results"/*.trx 2>/dev/null | wc -l)
if [ "$files" -ne "$projects" ]; then
  echo "Only $files of $projects test projects gave results." >&2
  failed=$((failed + projects - files))
fi
echo "$passed passed, $failed failed"
[ "$failed" -eq 0 ] && [ "$passed" -gt 0 ]
