#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# Installs the Debian packages that are missing. Usage: install.sh [tests]
set -eu
want="gcc g++ make cmake pkg-config libgmsh-dev libsuitesparse-dev libcjson-dev libopenblas-dev libcairo2-dev
libmuparser-dev zlib1g-dev fonts-dejavu-core"
[ "${1:-}" = tests ] && want="$want libcmocka-dev freefem++ libxml2-utils poppler-utils python3 python3-vtk9"
missing=
for package in $want; do
    dpkg-query -W -f='${Status}' "$package" 2>/dev/null | grep -q 'ok installed' || missing="$missing $package"
done
[ -z "$missing" ] && exit 0
echo "installing:$missing"
as_root=
[ "$(id -u)" = 0 ] || as_root=sudo
$as_root apt-get update -qq
# shellcheck disable=SC2086
$as_root env DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends $missing >/dev/null
