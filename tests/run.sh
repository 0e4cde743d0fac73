#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# Installs what is missing (Debian), builds with warnings as errors, runs every test, then runs the suite once
# more under AddressSanitizer and UndefinedBehaviorSanitizer. Usage: sh tests/run.sh [build folder]
set -eu
top=$(cd "$(dirname "$0")/.." && pwd)
build=${1:-$top/build}
sh "$top/tests/install.sh" tests
export OPENBLAS_NUM_THREADS=1
jobs=$(nproc)
cmake -S "$top" -B "$build" -DUNTWIST_TESTS=ON -DUNTWIST_WERROR=ON >/dev/null
cmake --build "$build" -j "$jobs"
(cd "$build" && ctest --output-on-failure --no-tests=error -j "$jobs")
cmake -S "$top" -B "$build-sanitize" -DCMAKE_BUILD_TYPE=RelWithDebInfo -DUNTWIST_WERROR=ON -DUNTWIST_SANITIZE=ON \
    >/dev/null
cmake --build "$build-sanitize" -j "$jobs"
# The dynamic loader and Gmsh's own libraries keep memory until the process ends; our own balance is tested by
# the suite itself, so the leak detector stays off here.
(cd "$build-sanitize" && ASAN_OPTIONS=detect_leaks=0 ctest --output-on-failure --no-tests=error -j "$jobs" -LE slow)
