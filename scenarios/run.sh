#!/usr/bin/env bash
# Installs what is missing, builds the program and runs it on the demo site.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/../src/cmake/prepare.sh"

install_missing "${build_packages[@]}"
[ -f "$root/build/CMakeCache.txt" ] || configure -DRAINLEDGER_TESTS=OFF
build --target rainledger_program
echo "Running: build/rainledger losses scenarios/tannery_lane.yaml"
echo
"$root/build/rainledger" losses "$root/scenarios/tannery_lane.yaml"
