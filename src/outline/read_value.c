/* SPDX-License-Identifier: GPL-3.0-or-later
 * The values a section file is made of: numbers, points, texts, and objects read by a table of
 * their keys. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "outline/read.h"

static utw_status wrong_kind(utw_reader *r, const utw_json *value, const char *what,
                             const char *wanted)
{
    return utw_fail(r->err, UTW_E_SYNTAX, "%s must be %s, not %s", what, wanted,
                    utw_json_kind_text(value));
}

/* How much of a user's word a message shows. */
#define SHOWN       "%.60s%s"
#define shown(word) word, strlen(word) > 60 ? "..." : ""

static utw_status unknown_key(utw_reader *r, const char *name, const utw_key *key, int n_key)
{
    const char *known[32];
    char list[256] = "";
    size_t used = 0;
    for (int k = 0; k < n_key; k++) {
        known[k] = key[k].name;
        const int n =
            snprintf(list + used, sizeof list - used, "%s%s", k > 0 ? ", " : "", key[k].name);
        if (n > 0 && used + (size_t)n < sizeof list) used += (size_t)n;
    }
    const int near = utw_nearest_word(name, known, n_key);
    if (near >= 0)
        return utw_fail(r->err, UTW_E_SYNTAX, "unknown key \"" SHOWN "\"; did you mean \"%s\"?",
                        shown(name), known[near]);
    return utw_fail(r->err, UTW_E_SYNTAX, "unknown key \"" SHOWN "\"; known here: %s", shown(name),
                    list);
}

utw_status utw_read_object(utw_reader *r, const utw_json *object, const char *what,
                           const utw_key *key, int n_key, void *target, unsigned *given)
{
    unsigned seen = 0;
    if (utw_json_kind_of(object) != UTW_JSON_OBJECT)
        return wrong_kind(r, object, what, "an object {...}");
    /* keys first, so that a misspelt one is named before whatever its absence causes */
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m)) {
        int k = 0;
        while (k < n_key && strcmp(key[k].name, utw_json_key(m)) != 0) k++;
        if (k == n_key) return unknown_key(r, utw_json_key(m), key, n_key);
        if (seen & 1u << k)
            return utw_fail(r->err, UTW_E_SYNTAX, "the key \"%s\" is given twice; remove one",
                            key[k].name);
        seen |= 1u << k;
    }
    /* in the order of the table, because some keys need what others have given */
    for (int k = 0; k < n_key; k++) {
        if (!(seen & 1u << k)) continue;
        const utw_json *m = utw_json_first(object);
        while (strcmp(key[k].name, utw_json_key(m)) != 0) m = utw_json_next(m);
        char quoted[40];
        snprintf(quoted, sizeof quoted, "\"%s\"", key[k].name);
        const utw_status st = key[k].read(r, m, quoted, (char *)target + key[k].offset);
        if (st != UTW_OK) return st;
    }
    if (given != NULL) *given = seen;
    return UTW_OK;
}

utw_status utw_read_number(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    double *number = target;
    const utw_json_kind kind = utw_json_kind_of(value);
    if (kind == UTW_JSON_STRING) {
        const utw_status st = utw_let_evaluate(r->let, utw_json_string(value), number, r->err);
        if (st != UTW_OK) utw_error_prefix(r->err, "%s: ", what);
        return st;
    }
    if (kind != UTW_JSON_NUMBER) return wrong_kind(r, value, what, "a number");
    if (!isfinite(utw_json_number(value)))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s is a number too large to be held (beyond 1.8e308)", what);
    *number = utw_json_number(value);
    return UTW_OK;
}

/* Name number k of a value called `what` after its place in `form`: "y of "at"" by "a point [x,
 * y]". */
static void name_number(char *name, size_t size, const char *form, int k, const char *what)
{
    const char *start = strchr(form, '[');
    for (; start != NULL && k > 0; k--) start = strchr(start + 1, ',');
    start = start == NULL ? "" : start + 1 + strspn(start + 1, " ");
    snprintf(name, size, "%.*s of %.60s", (int)strcspn(start, ",]"), start, what);
}

utw_status utw_read_numbers(utw_reader *r, const utw_json *value, const char *what,
                            const char *form, int least, int most, double *number, int *n)
{
    const int is_array = utw_json_kind_of(value) == UTW_JSON_ARRAY;
    const int count = is_array ? utw_json_count(value) : 0;
    if (!is_array)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be %s, not %s", what, form,
                        utw_json_kind_text(value));
    if (count < least || count > most)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be %s; it has %d member%s", what, form,
                        count, count == 1 ? "" : "s");
    int k = 0;
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m), k++) {
        if (utw_read_number(r, m, what, &number[k]) == UTW_OK) continue;
        char name[96]; /* again, for the message; nothing is spent on names while all goes well */
        name_number(name, sizeof name, form, k, what);
        return utw_read_number(r, m, name, &number[k]);
    }
    *n = count;
    return UTW_OK;
}

utw_status utw_read_point(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    double xy[2];
    int n;
    const utw_status st = utw_read_numbers(r, value, what, "a point [x, y]", 2, 2, xy, &n);
    if (st == UTW_OK) memcpy(target, xy, sizeof xy);
    return st;
}

utw_status utw_read_text(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    char **text = target;
    if (utw_json_kind_of(value) != UTW_JSON_STRING)
        return wrong_kind(r, value, what, "a text in double quotes");
    const char *given = utw_json_string(value);
    if (strlen(given) > UTW_LONGEST_NAME)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s is %zu bytes long; at most %d are allowed", what,
                        strlen(given), UTW_LONGEST_NAME);
    for (const char *c = given; *c != '\0'; c++)
        if ((unsigned char)*c < 0x20 || *c == 0x7F)
            return utw_fail(r->err, UTW_E_SYNTAX,
                            "%s holds a line break or another control character; remove it", what);
    char *copy = utw_copy_string(given);
    if (copy == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%s)", what);
    utw_free(*text);
    *text = copy;
    return UTW_OK;
}

utw_status utw_read_array(utw_reader *r, const utw_json *value, const char *what, int most, int *n)
{
    if (utw_json_kind_of(value) != UTW_JSON_ARRAY)
        return wrong_kind(r, value, what, "an array [...]");
    *n = utw_json_count(value);
    if (*n > most)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s has %d members; at most %d are read", what, *n,
                        most);
    return UTW_OK;
}
