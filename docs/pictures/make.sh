#!/usr/bin/env bash
# Draws the pictures of the documentation from scenarios/: make.sh PROGRAM [FOLDER]
# They go beside this script unless FOLDER is given. Needs gnuplot.
set -euo pipefail
program=$(realpath "$1")
here=$(cd "$(dirname "${BASH_SOURCE[0]}")" && pwd)
folder=$(realpath "${2:-$here}")
cd "$here/../../scenarios"

draw() {
    local picture=$1
    shift
    "$program" "$@" --quiet --chart "$folder/$picture" >/dev/null
}

draw ten_year_storm.svg storm tannery_lane_storms.yaml --storm 10-year
draw verge_ledger.svg losses tannery_lane.yaml --surface verge
draw four_methods.svg losses four_laws.yaml
