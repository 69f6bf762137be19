#!/usr/bin/env bash
# A short fuzz run on each reader: run.sh BUILD_FOLDER SECONDS. Seeds are the scenarios of the tree.
set -euo pipefail
root=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)
build=$(cd "$1" && pwd)
seconds=$2

seeds=$(mktemp -d)
trap 'rm -rf "$seeds"' EXIT
mkdir "$seeds/csv" "$seeds/record" "$seeds/scenario" "$seeds/statistics"
for file in "$root"/scenarios/*.csv; do
    (printf '\0'; cat "$file") >"$seeds/csv/$(basename "$file")"
done
printf '\1end [min],depth [mm]\n5,0.4\n10,1.1\n' >"$seeds/csv/elapsed"
printf '\3start;end;intensity [in/h]\n2031-03-30 01:00;2031-03-30 01:05;0,5\n' >"$seeds/csv/comma"
(printf '!'; cat "$root/scenarios/tannery_lane_logger.csv") >"$seeds/record/tips"
printf '\3time,count\n2031-06-14 13:45,7\n2031-06-14 13:50,9\ntime,count\n2031-06-14 13:45,7\n%s' \
    '2031-06-14 13:50,9' >"$seeds/record/counter"
printf '\20end,depth [mm]\n2031-06-14T13:45Z,0.4\n2031-06-14T14:00Z,1\n2031-06-14T14' \
    >"$seeds/record/interval"
cp "$root"/scenarios/*.yaml "$seeds/scenario/"
for design in 'pattern: keifer_chu, peak_at: 0.4, formula: {a: 96 in/h, b: 14, m: 0.97, n: 1, time: min}' \
    'pattern: alternating_blocks, depths: {5 min: 9 mm, 2 h: 40 mm}' \
    'pattern: mass_curve, depth: 62 mm, interpolate: smooth, curve: [[0, 0], [0.3, 0.6], [1, 1]]' \
    'pattern: triangular, depth: 2.5 in'; do
    printf 'storm: {design: {duration: 2 h, every: 5 min, %s}, resample: 9 min}\n%s\n' "$design" \
        'surfaces: {a: {area: 1 ha, losses: impervious}}' >"$seeds/scenario/${design:9:5}.yaml"
done
cp "$root"/scenarios/*.csv "$seeds/statistics/"
cat >"$seeds/statistics/published" <<'END'
Precipitation frequency estimates (inches)
by duration for ARI (years):, 1,2,5,10
5-min:, 0.36,0.43,0.53,0.62
24-hr:, 2.23,2.67,3.34,3.91

UPPER BOUND
by duration for ARI (years):, 1,2,5,10
5-min:, 0.40,0.47,0.59,0.68
END
printf 'duration [min];intensity [mm/h]\n5;150,0\n60;41\n' >"$seeds/statistics/list"

for reader in csv record scenario statistics; do
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
