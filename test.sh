#!/usr/bin/env bash
# Passes every test: ./test.sh. Ends with one line, "N passed, N failed".
# The browser tests use GLASSPAIR_BROWSER where it is set, else a Chromium found here, else one installed by apt.
set -uo pipefail
cd "$(dirname "$0")"
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1

find_browser() {
  local candidate
  for candidate in "${GLASSPAIR_BROWSER:-}" /usr/bin/chromium /usr/bin/chromium-browser /usr/bin/google-chrome /usr/bin/microsoft-edge; do
    [ -n "$candidate" ] && [ -x "$candidate" ] && { echo "$candidate"; return; }
  done
}

browser=$(find_browser)
if [ -z "$browser" ] && command -v apt-get >/dev/null; then
  echo "No browser found: installing Debian's chromium."
  as_root=$([ "$(id -u)" -eq 0 ] || echo sudo)
  $as_root apt-get update -qq && DEBIAN_FRONTEND=noninteractive $as_root apt-get install -y -qq chromium fonts-liberation >/dev/null
  browser=$(find_browser)
fi
echo "Browser tests use: ${browser:-no browser; they will fail and say so}"
export GLASSPAIR_BROWSER=$browser

results=$(mktemp -d)
trap 'rm -rf "$results"' EXIT
dotnet test GlassPair.sln --logger trx --results-directory "$results"
status=$?

# The rankings must be the same on processors with narrower vectors, and with none that the kernels use.
for switch in DOTNET_EnableAVX512 DOTNET_EnableAVX2; do
  echo "Rankings once more with $switch=0"
  env "$switch=0" dotnet test tests/GlassPair.Optics.Tests --no-build --filter FullyQualifiedName~Rankings \
    --logger "trx;LogFileName=rankings-$switch.trx" --results-directory "$results" || status=1
done

passed=0 failed=0
for report in "$results"/*.trx; do
  [ -e "$report" ] || continue
  counters=$(grep -o '<Counters [^>]*>' "$report")
  passed=$((passed + $(sed 's/.* passed="\([0-9]*\)".*/\1/' <<<"$counters")))
  failed=$((failed + $(sed 's/.* failed="\([0-9]*\)".*/\1/' <<<"$counters")))
done
[ "$status" -eq 0 ] || [ "$failed" -gt 0 ] || failed=1
echo "$passed passed, $failed failed"
exit "$status"
