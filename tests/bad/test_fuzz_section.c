/* SPDX-License-Identifier: GPL-3.0-or-later
 * Thousands of damaged section files: each is read or refused with a message, and nothing else
 * happens. */
#include "outline/outline.h"

#include "support/support.h"

static const char *const good =
    "{\"name\": \"Bracket\", \"units\": \"mm N\", \"let\": {\"t\": 20, \"h\": \"5*t\"},"
    " \"materials\": {\"6082\": {\"E\": 70000, \"nu\": 0.33, \"density\": 2.7e-6, \"yield\": 250}},"
    " \"parts\": [{\"material\": \"6082\","
    " \"outline\": [[0,0], [100,0], {\"at\": [100,\"t\"], \"bulge\": -0.1}, {\"at\": [20,20], "
    "\"round\": 10},"
    " {\"at\": [\"t\",\"h\"], \"chamfer\": \"sqrt(9)\"}, {\"at\": [0,100], \"arc\": [8,104]},"
    " {\"at\": [0,60], \"bezier\": [[-3,90],[3,70]]}, {\"at\": [0,30], \"through\": "
    "[[-1,50],[1,40]], \"round\": 2}],"
    " \"holes\": [{\"circle\": [10,10,4]}, {\"ellipse\": [60,10,8,4,30]}]}],"
    " \"loads\": [{\"name\": \"hook\", \"Vy\": -1500, \"at\": [30,0], \"Mx\": 2.0e5}]}";

/* xorshift64 (Marsaglia, J. Statistical Software 8 (2003) no. 14): the same files on every machine.
 */
static unsigned long long random_state = 88172645463325252ull;
static size_t pick(size_t n)
{
    random_state ^= random_state << 13;
    random_state ^= random_state >> 7;
    random_state ^= random_state << 17;
    return (size_t)(random_state % n);
}

static const char *const nasty[] = {
    "0",
    "-0",
    "1e-320",
    "1e308",
    "1e999",
    "-1e300",
    "1e-9",
    "null",
    "true",
    "\"\"",
    "[]",
    "{}",
    "[[]]",
    "\"at\"",
    "\"round\": 1e9,",
    "\"\\u0000\"",
    "\\",
    "\"",
    "\xC3",
    "[0,0],",
    "[100,0],",
    "\"circle\": [0,0,1],",
    "{\"at\": [5,5]},",
    "NaN",
    "-",
    ",",
    ":",
    "[",
    "}",
};

enum { N_NUMBER = 7 }; /* the first ones are numbers */

/* Damage text[*n] (capacity bytes) in one place; gently: only its numbers. */
static void damage(char *text, size_t *n, size_t capacity, int gently)
{
    const size_t at = pick(*n);
    const size_t kind = !gently ? pick(6) : pick(4) == 0 ? 5 : 2;
    if (kind == 0) {
        text[at] = (char)pick(256);
    } else if (kind == 1) { /* remove a piece */
        size_t length = 1 + pick(12);
        if (length > *n - at) length = *n - at;
        memmove(text + at, text + at + length, *n - at - length);
        *n -= length;
    } else if (kind == 2) { /* one digit for another: the text stays sound */
        for (size_t i = 0; i < *n; i++) {
            char *c = &text[(at + i) % *n];
            if (*c < '0' || *c > '9') continue;
            *c = (char)('0' + pick(10));
            break;
        }
    } else if (kind == 3) { /* repeat a piece */
        size_t length = 1 + pick(40);
        if (length > *n - at) length = *n - at;
        if (*n + length > capacity) return;
        memmove(text + at + length, text + at, *n - at);
        *n += length;
    } else { /* put something in, or in place of a number */
        const char *word = nasty[pick(gently ? N_NUMBER : sizeof nasty / sizeof nasty[0])];
        const size_t length = strlen(word);
        size_t from = at, to = at;
        while (kind == 5 && from < *n && (text[from] < '0' || text[from] > '9')) from++;
        for (to = from; kind == 5 && to < *n && strchr("0123456789.e-", text[to]) != NULL; to++) {
        }
        if (*n - (to - from) + length > capacity) return;
        memmove(text + from + length, text + to, *n - to);
        memcpy(text + from, word, length);
        *n = *n - (to - from) + length;
    }
    if (*n == 0) text[(*n)++] = '{';
}

static void damaged_files_are_read_or_refused(void **state)
{
    (void)state;
    enum { CAPACITY = 4096 };
    int read = 0, refused[UTW_E_INTERNAL + 1] = {0};
    for (int i = 0; i < 6000; i++) {
        char *text = malloc(CAPACITY); /* a block of its own, so that a sanitizer sees its end */
        assert_non_null(text);
        size_t n = strlen(good);
        memcpy(text, good, n);
        for (size_t k = 0, times = 1 + pick(4); k < times; k++) damage(text, &n, CAPACITY, i % 2);
        char *exact = malloc(n);
        assert_non_null(exact);
        memcpy(exact, text, n);
        utw_outline *outline = NULL;
        utw_error err;
        const utw_status st = utw_outline_parse(exact, n, "fuzz", &outline, &err);
        free(exact);
        free(text);
        if (st == UTW_OK) {
            assert_true(utw_loop_area(&outline->part[0].loop[0]) > 0);
            read++;
        } else {
            assert_null(outline);
            assert_true(strncmp(err.text, "fuzz: ", 6) == 0 && strlen(err.text) > 12);
            refused[st]++;
        }
        utw_outline_free(outline);
    }
    print_message("%d read, refused: %d syntax, %d outline, %d material, %d load\n", read,
                  refused[UTW_E_SYNTAX], refused[UTW_E_OUTLINE], refused[UTW_E_MATERIAL],
                  refused[UTW_E_LOAD]);
    /* the mutations must reach every depth of the reader */
    assert_true(read > 500 && refused[UTW_E_SYNTAX] > 500 && refused[UTW_E_OUTLINE] > 500);
    assert_true(refused[UTW_E_MATERIAL] > 5 && refused[UTW_E_INTERNAL] == 0 &&
                refused[UTW_E_NOMEM] == 0);
}

static void the_undamaged_file_is_read(void **state)
{
    (void)state;
    utw_outline_free(utw_outline_of(good));
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_undamaged_file_is_read),
        balanced_test(damaged_files_are_read_or_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
