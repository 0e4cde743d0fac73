#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# A folder of src/ may include only itself and the folders before it in this list, and each foreign library
# is named in one place only. Usage: layers.sh SRC
src=$1
order="base outline mesh field section thinwall bar draw report cli"
bad=0
allowed=
for folder in $order; do
    allowed="$allowed $folder"
    [ -d "$src/$folder" ] || continue
    for file in "$src/$folder"/*.c "$src/$folder"/*.h; do
        [ -f "$file" ] || continue
        for target in $(sed -n 's/^#include "\([a-z]*\)\/.*/\1/p' "$file" | sort -u); do
            case " $allowed " in
            *" $target "*) ;;
            *) echo "$file includes $target/, which lies above $folder/"; bad=1 ;;
            esac
        done
    done
done
foreign() { # header pattern, folders that may name it
    for file in $(grep -lE "#include <($1)" "$src"/*/*.c "$src"/*/*.h); do
        folder=$(basename "$(dirname "$file")")
        case " $2 " in
        *" $folder "*) ;;
        *) echo "$file names <$1>, which belongs to: $2"; bad=1 ;;
        esac
    done
}
foreign 'gmshc?\.h' mesh
foreign 'cholmod\.h' field
foreign 'cairo' draw
foreign 'zlib' draw
foreign 'cjson/' "outline report"
foreign 'muParser' outline
exit $bad
