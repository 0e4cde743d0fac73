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
    int row[LONGEST + 1]; /* distances from the first i characters of a to every prefix of b */
    for (size_t j = 0; j <= nb; j++) row[j] = (int)j;
    for (size_t i = 1; i <= na; i++) {
        int diagonal = row[0];
        row[0] = (int)i;
        for (size_t j = 1; j <= nb; j++) {
            const int above = row[j];
            int least = diagonal + (lower(a[i - 1]) != lower(b[j - 1]));
            if (above + 1 < least) least = above + 1;
            if (row[j - 1] + 1 < least) least = row[j - 1] + 1;
            diagonal = above;
            row[j] = least;
        }
    }
    return row[nb];
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
