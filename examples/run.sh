#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# The first try: installs what is missing (Debian), builds into build/, solves a section, draws its warping and writes
# the table, the JSON and the picture into examples/out/. Usage: sh examples/run.sh [NAME], where examples/NAME.json is
# the section.
set -eu
top=$(cd "$(dirname "$0")/.." && pwd)
name=${1:-t-slot-rail}
[ -f "$top/examples/$name.json" ] || { echo "there is no examples/$name.json" >&2; exit 2; }
sh "$top/tests/install.sh"
export OPENBLAS_NUM_THREADS=1
# a build folder that is there keeps its settings; the tests are not needed here
[ -f "$top/build/CMakeCache.txt" ] || cmake -S "$top" -B "$top/build" -DUNTWIST_TESTS=OFF >/dev/null
cmake --build "$top/build" -j "$(nproc)" --target untwist_cli
mkdir -p "$top/examples/out"
cd "$top/examples"
"$top/build/src/cli/untwist" solve "$name.json" --json "out/$name.json" >"out/$name.txt"
"$top/build/src/cli/untwist" draw "$name.json" --show warping -o "out/$name.png"
cat "out/$name.txt"
echo
echo "This table is examples/out/$name.txt, all numbers in full are examples/out/$name.json,"
echo "and examples/out/$name.png shows how the section warps when the bar is twisted."
echo "The program is build/src/cli/untwist; 'build/src/cli/untwist help' tells what it can do."
