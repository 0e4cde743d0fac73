#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# untwist and FreeFem++ (P2 and P4, adapted by the same shares of the bracket) on the same five sections to the same
# relative gap of J, in one run: one JSON line a result (untwist: medians of nine). Usage: sh tests/bench/run.sh BUILD [TOLERANCE] [RUNS]
set -eu
here=$(cd "$(dirname "$0")" && pwd)
build=$1 tolerance=${2:-1e-6} runs=${3:-5}
export OPENBLAS_NUM_THREADS=1 OMP_NUM_THREADS=1
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
plugin=$(dpkg -L libfreefem++ 2>/dev/null | grep '/Element_P4.so$' | grep -v /mpi/ | head -1)
[ -z "$plugin" ] || FF_LOADPATH=$(dirname "$plugin")
export FF_LOADPATH
for c in L Lr tube tslot foil; do
    "$build/tests/bench/bench" --tol "$tolerance" --runs 9 "$here/sections/$c.json"
    command -v FreeFem++ >/dev/null || continue
    for e in P2 P4; do
        [ "$c$e" = foilP4 ] && continue # minutes: its polygon must follow the curves
        python3 "$here/freefem/sec2edp.py" "$here/sections/$c.sec" $e >"$work/$c$e.edp"
        i=0
        while [ $i -lt "$runs" ]; do
            FreeFem++ -nw -v 0 "$work/$c$e.edp" -target "$tolerance" 2>/dev/null | grep '^{' | tail -1 |
                sed "s/^{/{\"case\": \"$c\", \"peer\": \"FreeFem++ $e\", /"
            i=$((i + 1))
        done
    done
done
