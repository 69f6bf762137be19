#!/usr/bin/env bash
# Installs what is missing, builds everything and runs the whole test suite.
set -euo pipefail
. "$(dirname "${BASH_SOURCE[0]}")/../src/cmake/prepare.sh"

install_missing "${build_packages[@]}" catch2 python3 python3-jsonschema python3-mpmath \
    python3-numpy python3-scipy python3-yaml
configure -DRAINLEDGER_TESTS=ON
build
echo "Running the tests"
cd "$root/build"
exec ctest --output-on-failure --no-tests=error -j "$(nproc)"
