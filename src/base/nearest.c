/* SPDX-License-Identifier: GPL-3.0-or-later
 * Distance between words, for suggestions in messages. */
#include "base/nearest.h"

#include <string.h>

enum { LONGEST = 63, FAR = 1000 };

/* ASCII only: the user's locale must not change what a file means. */
static int lower(char c)
{
    return c >= 'A' && c <= 'Z' ? c - 'A' + 'a' : c;
}

int utw_word_distance(const char *a, const char *b)
{
    const size_t na = strlen(a), nb = strlen(b);
    if (na > LONGEST || nb > LONGEST) return FAR;
    /* rows i-2, i-1 and i of the table of distances between prefixes */
    int table[3][LONGEST + 1];
    int *older = table[0], *above = table[1], *row = table[2];
    for (size_t j = 0; j <= nb; j++) above[j] = (int)j;
    for (size_t i = 1; i <= na; i++) {
        row[0] = (int)i;
        for (size_t j = 1; j <= nb; j++) {
            const int x = lower(a[i - 1]), y = lower(b[j - 1]);
            int least = above[j - 1] + (x != y);
            if (above[j] + 1 < least) least = above[j] + 1;
            if (row[j - 1] + 1 < least) least = row[j - 1] + 1;
            if (i > 1 && j > 1 && x == lower(b[j - 2]) && y == lower(a[i - 2]) &&
                older[j - 2] + 1 < least)
                least = older[j - 2] + 1;
            row[j] = least;
        }
        int *const free_row = older;
        older = above;
        above = row;
        row = free_row;
    }
    return above[nb];
}

int utw_nearest_word(const char *word, const char *const *candidate, int n)
{
    const size_t length = strlen(word);
    const int allowed = length < 6 ? 1 : length < 9 ? 2 : 3;
    int best = -1, least = allowed + 1;
    for (int i = 0; i < n; i++) {
        const int d = utw_word_distance(word, candidate[i]);
        /* two single letters are one edit apart and yet have nothing in common */
        if (d < least && d < (int)length && d < (int)strlen(candidate[i])) {
            least = d;
            best = i;
        }
    }
    return best;
}
