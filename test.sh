#!/usr/bin/env bash
# Passes every test: ./test.sh. Ends with one line, "N passed, N failed".
set -uo pipefail
cd "$(dirname "$0")"
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1

results=$(mktemp -d)
trap 'rm -rf "$results"' EXIT
dotnet test GlassPair.sln --logger trx --results-directory "$results"
status=$?

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
