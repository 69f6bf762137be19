# Sourced by the two set-up scripts and by .ci/run: installs Debian packages that are missing and builds.

root=$(cd "$(dirname "${BASH_SOURCE[0]}")/../.." && pwd)

build_packages=(g++ cmake ninja-build libboost-dev libboost-program-options-dev libeigen3-dev libfmt-dev
                libhowardhinnant-date-dev libyaml-cpp-dev nlohmann-json3-dev tzdata gnuplot-nox)

as_root() {
    if [ "$(id -u)" -eq 0 ]; then "$@"; else sudo "$@"; fi
}

# install_missing PACKAGE...
install_missing() {
    local missing=() package
    for package in "$@"; do
        dpkg-query -W -f '${db:Status-Status}' "$package" 2>/dev/null | grep -qx installed ||
            missing+=("$package")
    done
    [ ${#missing[@]} -eq 0 ] && return
    echo "Installing ${missing[*]}"
    as_root apt-get update -qq
    as_root env DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends \
        "${missing[@]}" >/dev/null
}

# configure OPTION...: only what the build folder does not know yet
configure() {
    local generator=()
    [ -f "$root/build/CMakeCache.txt" ] || generator=(-G Ninja -DCMAKE_BUILD_TYPE=Release)
    cmake -S "$root" -B "$root/build" "${generator[@]}" "$@" >/dev/null
}

build() {
    echo "Building in build/"
    cmake --build "$root/build" -j "$(nproc)" "$@" | tail -n 1
}
