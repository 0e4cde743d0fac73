#!/bin/sh
# SPDX-License-Identifier: GPL-3.0-or-later
# Every source file has its place in DEVELOPERS.md under its folder, every document its line in docs/README.md, and
# no file outgrows its subject. Usage: house.sh TOP
cd "$1" || exit 1
ls src/*/*.c src/*/*.h docs/*.md docs/*.1 | awk '
BEGIN {
    while ((getline line <"DEVELOPERS.md") > 0) {
        if (match(line, /^\*\*`[a-z\/]*\/`\*\*/)) folder = substr(line, 4, RLENGTH - 7)
        if (line ~ /^## /) folder = ""
        page[folder] = page[folder] line "\n"
    }
    while ((getline line <"docs/README.md") > 0) index_page = index_page line "\n"
}
{
    name = $0
    sub(/.*\//, "", name)
    folder = substr($0, 1, length($0) - length(name) - 1)
    if (folder == "docs") {
        if (name != "README.md" && !index(index_page, "(" name ")")) { print "docs/README.md lacks " name; bad = 1 }
        next
    }
    sub(/\.[ch]$/, "", name)
    if (!index(page[folder], "`" name "`")) { print "DEVELOPERS.md: " folder "/ lacks `" name "`"; bad = 1 }
}
END { exit bad }' || exit 1
wc -l src/*/*.c src/*/*.h tests/*/*.c | awk '$2 != "total" && $1 > 550 { print $2 " has " $1 " lines: two subjects?"; bad = 1 }
END { exit bad }'
