#!/usr/bin/env bash
# A short fuzz run on each reader: run.sh BUILD_FOLDER SECONDS. Seeds are the scenarios of the tree.
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)
build=$(cd "$1" && pwd)
seconds=$2

seeds=$(mktemp -d)
trap 'rm -rf "$seeds"' EXIT
mkdir "$seeds/csv" "$seeds/scenario"
for file in "$root"/scenarios/*.csv; do
    (printf '\0'; cat "$file") >"$seeds/csv/$(basename "$file")"
done
printf '\1end [min],depth [mm]\n5,0.4\n10,1.1\n' >"$seeds/csv/elapsed"
printf '\3start;end;intensity [in/h]\n2031-03-30 01:00;2031-03-30 01:05;0,5\n' >"$seeds/csv/comma"
cp "$root"/scenarios/*.yaml "$seeds/scenario/"

for reader in csv scenario; do
    echo "fuzzing the $reader reader for $seconds s"
    status=0
    (cd "$seeds" && "$build/tests/fuzz/fuzz_$reader" -max_total_time="$seconds" -max_len=4096 \
        -timeout=10 -rss_limit_mb=2048 -print_final_stats=1 "$seeds/$reader") \
        >"$seeds/log" 2>&1 || status=$?
    executed=$(sed -n 's/^stat::number_of_executed_units: *//p' "$seeds/log")
    if [ "$status" -ne 0 ] || [ "${executed:-0}" -lt 1000 ]; then
        tail -n 40 "$seeds/log"
        for found in "$seeds"/crash-* "$seeds"/timeout-* "$seeds"/oom-* "$seeds"/leak-*; do
            if [ -f "$found" ]; then
                echo "the input, in base64:"
                base64 "$found"
            fi
        done
        exit 1
    fi
    echo "$executed inputs, no fault"
done
