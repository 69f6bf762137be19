#!/usr/bin/env bash
# Installs the build into a temporary place, builds docs/library against it as another project would,
# runs it and compares what its programs print with docs/library.md, line for line.
# library_example.sh SOURCE BUILD CXX
set -euo pipefail
source=$1
build=$2
compiler=$3

place=$(mktemp -d)
trap 'rm -rf "$place"' EXIT
cmake --install "$build" --prefix "$place/installed" >/dev/null
"$place/installed/bin/rainledger" --version
cmake -S "$source/docs/library" -B "$place/example" -G Ninja -DCMAKE_BUILD_TYPE=Release \
    -DCMAKE_CXX_COMPILER="$compiler" -DCMAKE_PREFIX_PATH="$place/installed" \
    -DCMAKE_EXE_LINKER_FLAGS="${LIBRARY_EXAMPLE_LINK_FLAGS:-}" >/dev/null
cmake --build "$place/example" | tail -n 1
for example in verge storms; do
    "$place/example/${example}_example" | tee "$place/output"
    # The block of docs/library.md that begins with the first line printed.
    awk -v first="$(head -n 1 "$place/output")" \
        '$0 == first { shown = 1 } /^```$/ { shown = 0 } shown' "$source/docs/library.md" |
        diff - "$place/output"
done
