#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# Draws the pictures of gallery.md and of README.md again. Usage: sh docs/gallery.sh [PROGRAM]
set -eu
top=$(cd "$(dirname "$0")/.." && pwd)
untwist=${1:-$top/build/src/cli/untwist}
export OPENBLAS_NUM_THREADS=1
mkdir -p "$top/docs/gallery"
for name in corner-bracket t-slot-rail two-chamber-mullion machined-channel keyed-shaft aerofoil-box bulb-flat solid-cam; do
    for kind in outline mesh warping warped; do
        "$untwist" draw "$top/examples/$name.json" --show "$kind" --width 100mm --dpi 110 -o "$top/docs/gallery/$kind-$name.png"
    done
done
for name in corner-bracket t-slot-rail two-chamber-mullion machined-channel keyed-shaft aerofoil-box bulb-flat solid-cam; do
    for stress in von_mises sigma_z tau; do
        "$untwist" draw "$top/examples/$name.json" --show stress --component "$stress" --width 100mm --dpi 110 \
            -o "$top/docs/gallery/$stress-$name.png"
    done
done
"$untwist" draw "$top/examples/t-slot-rail.json" --show warping --width 120mm --dpi 130 -o "$top/docs/warping.png"
