#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# Installs the build into a temporary prefix, builds examples/embed against it by find_package and by pkg-config, and
# runs the results. Usage: package.sh BUILD SOURCE CC VERSION
set -eu
build=$1 source=$2 cc=$3 version=$4
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
export OPENBLAS_NUM_THREADS=1

step() { printf '%s\n' "$1"; }
quiet() { "$@" >"$work/log" 2>&1 || { cat "$work/log"; exit 1; }; }

step "install"
quiet cmake --install "$build" --prefix "$work/usr"
prefix=$work/usr
lib=$(dirname "$(find "$prefix" -name libuntwist.a)")
for file in include/untwist.h bin/untwist share/man/man1/untwist.1; do
    [ -f "$prefix/$file" ] || { echo "$file is not installed"; exit 1; }
done
[ -f "$prefix/share/doc/untwist/section-file.md" ] || { echo "the documents are not installed"; exit 1; }
section=$prefix/share/doc/untwist/examples/machined-channel.json
[ -f "$section" ] || { echo "the examples are not installed"; exit 1; }

step "the installed program"
[ "$("$prefix/bin/untwist" --version | head -n 1)" = "untwist $version" ]
quiet "$prefix/bin/untwist" solve "$section" --quiet

step "only what the header declares is visible"
nm -D --defined-only "$lib/libuntwist.so" | sed 's/.* //' | grep -vE '^(__bss_start|_edata|_end)$' | sort >"$work/visible"
sed -n 's/^UTW_API .*[ *]\(utw_[a-z0-9_]*\)(.*/\1/p' "$source/src/untwist.h" | sort >"$work/declared"
diff "$work/declared" "$work/visible"

step "find_package"
quiet cmake -S "$source/examples/embed" -B "$work/embed" -DCMAKE_C_COMPILER="$cc" -DCMAKE_PREFIX_PATH="$prefix"
quiet cmake --build "$work/embed"
"$work/embed/embed" "$section" >"$work/by-cmake"
"$work/embed/embed_static" "$section" >"$work/static"

step "pkg-config"
export PKG_CONFIG_PATH="$lib/pkgconfig"
[ "$(pkg-config --modversion untwist)" = "$version" ]
# shellcheck disable=SC2046
quiet "$cc" -std=c11 -Wall -Werror "$source/examples/embed/embed.c" $(pkg-config --cflags --libs untwist) \
    -Wl,-rpath,"$lib" -o "$work/embed-pc"
"$work/embed-pc" "$section" >"$work/by-pkg-config"

step "the same numbers by every way"
cmp "$work/by-cmake" "$work/static"
cmp "$work/by-cmake" "$work/by-pkg-config"
[ "$(wc -l <"$work/by-cmake")" = 7 ]
cat "$work/by-cmake"

step "its error"
if "$work/embed-pc" nothing.json 2>"$work/message" >/dev/null; then echo "no error"; exit 1; fi
grep -q '^embed: nothing.json: cannot be opened' "$work/message"

step "a wrong version is refused"
sed 's/find_package(untwist 0.1/find_package(untwist 9.1/' "$source/examples/embed/CMakeLists.txt" >"$work/CMakeLists.txt"
cp "$source/examples/embed/embed.c" "$work/"
if cmake -S "$work" -B "$work/wrong" -DCMAKE_PREFIX_PATH="$prefix" >"$work/log" 2>&1; then echo "accepted"; exit 1; fi
grep -q 'compatible with requested version "9.1' "$work/log"
