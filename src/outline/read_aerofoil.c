/* SPDX-License-Identifier: GPL-3.0-or-later
 * "aerofoil" inside "shape". */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "outline/aerofoil.h"
#include "outline/read.h"

/* An aerofoil while it is read. */
typedef struct aerofoil_given {
    utw_aerofoil foil;
    char *naca, *points; /* owned */
    int sharp;
} aerofoil_given;

static utw_status read_skin(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_aerofoil *foil = target;
    int n = 0;
    if (utw_json_kind_of(value) == UTW_JSON_STRING && strcmp(utw_json_string(value), "solid") == 0)
        return UTW_OK; /* n_skin stays 0 */
    if (utw_json_kind_of(value) != UTW_JSON_ARRAY) {
        foil->n_skin = 1;
        foil->skin[0][0] = 0;
        return utw_read_number(r, value, what, &foil->skin[0][1]);
    }
    const utw_status st = utw_read_array(r, value, what, UTW_AEROFOIL_STATIONS, &n);
    if (st != UTW_OK) return st;
    if (n == 0)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s is empty; give a thickness, or [[part of chord, thickness], ...]",
                        what);
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        int two;
        const utw_status read =
            utw_read_numbers(r, m, "a station of \"skin\"", "[part of chord, thickness]", 2, 2,
                             foil->skin[foil->n_skin++], &two);
        if (read != UTW_OK) return read;
    }
    return UTW_OK;
}

static utw_status read_cap(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_aerofoil_spar *spar = target;
    double cap[2];
    int two;
    const utw_status st = utw_read_numbers(r, value, what, "[width, thickness]", 2, 2, cap, &two);
    if (st != UTW_OK) return st;
    if (!(cap[0] > 0 && cap[1] > 0))
        return utw_fail(r->err, UTW_E_OUTLINE, "%s is [%g, %g]; both must be greater than 0", what,
                        cap[0], cap[1]);
    spar->cap_width = cap[0];
    spar->cap_t = cap[1];
    return UTW_OK;
}

static const utw_key spar_key[] = {
    {"at", utw_read_number, offsetof(utw_aerofoil_spar, at)},
    {"t", utw_read_number, offsetof(utw_aerofoil_spar, t)},
    {"cap", read_cap, 0},
};

static utw_status read_spars(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_aerofoil *foil = target;
    int n;
    const utw_status st = utw_read_array(r, value, what, UTW_AEROFOIL_SPARS, &n);
    if (st != UTW_OK) return st;
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        unsigned given = 0;
        utw_aerofoil_spar spar = {.at = 0};
        char name[40];
        snprintf(name, sizeof name, "aerofoil, spar %d", foil->n_spar + 1);
        const utw_status read = utw_read_object(r, m, name, spar_key, 3, &spar, &given);
        if (read != UTW_OK) return read;
        if ((given & 3u) != 3u)
            return utw_fail(r->err, UTW_E_SYNTAX, "%s: \"%s\" is missing", name,
                            given & 1u ? "t" : "at");
        if (foil->n_spar > 0 && !(spar.at > foil->spar[foil->n_spar - 1].at))
            return utw_fail(r->err, UTW_E_OUTLINE,
                            "%s: \"at\" is %g; list the spars from the nose to the tail", name,
                            spar.at);
        foil->spar[foil->n_spar++] = spar;
    }
    return UTW_OK;
}

static utw_status read_end(utw_reader *r, const utw_json *value, const char *what,
                           utw_aerofoil_end *end, double *at)
{
    if (utw_json_kind_of(value) == UTW_JSON_STRING &&
        strcmp(utw_json_string(value), "solid") == 0) {
        *end = UTW_AEROFOIL_SOLID;
        return UTW_OK;
    }
    *end = UTW_AEROFOIL_FACE;
    if (utw_json_kind_of(value) != UTW_JSON_NUMBER && utw_json_kind_of(value) != UTW_JSON_STRING)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be \"solid\" or a part of the chord, not %s",
                        what, utw_json_kind_text(value));
    return utw_read_number(r, value, what, at);
}

static utw_status read_nose(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_aerofoil *foil = target;
    return read_end(r, value, what, &foil->nose, &foil->nose_at);
}

static utw_status read_tail(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_aerofoil *foil = target;
    return read_end(r, value, what, &foil->tail, &foil->tail_at);
}

static utw_status read_edge(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    const char *word = utw_json_kind_of(value) == UTW_JSON_STRING ? utw_json_string(value) : "";
    if (strcmp(word, "sharp") != 0 && strcmp(word, "blunt") != 0)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be \"sharp\" or \"blunt\"", what);
    *(int *)target = word[0] == 's';
    return UTW_OK;
}

static const utw_key aerofoil_key[] = {
    {"naca", utw_read_text, offsetof(aerofoil_given, naca)},
    {"points", utw_read_text, offsetof(aerofoil_given, points)},
    {"chord", utw_read_number, offsetof(aerofoil_given, foil.chord)},
    {"skin", read_skin, offsetof(aerofoil_given, foil)},
    {"spars", read_spars, offsetof(aerofoil_given, foil)},
    {"nose", read_nose, offsetof(aerofoil_given, foil)},
    {"tail", read_tail, offsetof(aerofoil_given, foil)},
    {"edge", read_edge, offsetof(aerofoil_given, sharp)},
    {"r", utw_read_number, offsetof(aerofoil_given, foil.r)},
};
enum {
    N_KEY = sizeof aerofoil_key / sizeof aerofoil_key[0],
    NACA = 1 << 0,
    POINTS = 1 << 1,
    CHORD = 1 << 2,
    SKIN = 1 << 3,
    EDGE = 1 << 7
};

/* A file named in a section file lies beside it. [out] *path, owned. */
static utw_status beside(const utw_reader *r, const char *name, char **path)
{
    const char *slash = r->path != NULL ? strrchr(r->path, '/') : NULL;
    const size_t folder = slash != NULL && name[0] != '/' ? (size_t)(slash - r->path) + 1 : 0;
    *path = utw_alloc(folder + strlen(name) + 1, 1);
    if (*path == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%s)", name);
    if (folder > 0) memcpy(*path, r->path, folder);
    memcpy(*path + folder, name, strlen(name) + 1);
    return UTW_OK;
}

static utw_status read_list(const utw_reader *r, const char *name, double (**xy)[2], int *n)
{
    char *path = NULL, *text = NULL;
    size_t length = 0;
    utw_status st = beside(r, name, &path);
    if (st == UTW_OK) {
        st = utw_read_file(path, &text, &length, r->err);
        if (st == UTW_OK) st = utw_aerofoil_points(text, length, xy, n, r->err);
        if (st != UTW_OK && st != UTW_E_NOMEM) utw_error_prefix(r->err, "%.200s: ", name);
    }
    utw_free(path);
    utw_free(text);
    return st;
}

static utw_status check_given(const utw_reader *r, unsigned given)
{
    const unsigned source = given & (NACA | POINTS);
    if (source != NACA && source != POINTS)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        source == 0
                            ? "aerofoil: \"naca\" or \"points\" is missing; give one of them"
                            : "aerofoil: \"naca\" and \"points\" are both given; keep one");
    if ((given & EDGE) && source == POINTS)
        return utw_fail(
            r->err, UTW_E_SYNTAX,
            "aerofoil: \"edge\" is for \"naca\"; the edge of a list of points is as listed");
    if (!(given & CHORD))
        return utw_fail(r->err, UTW_E_SYNTAX, "aerofoil: \"chord\" is missing; give its length");
    if (!(given & SKIN))
        return utw_fail(r->err, UTW_E_SYNTAX, "aerofoil: \"skin\" is missing; give its thickness");
    return UTW_OK;
}

utw_status utw_read_aerofoil(utw_reader *r, const utw_json *value, utw_part *part)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned given = 0;
    double(*xy)[2] = NULL;
    aerofoil_given *g = NULL;
    utw_error *err = r->err;
    UTW_TRY_ALLOC(g = utw_alloc(1, sizeof *g));
    UTW_TRY(utw_read_object(r, value, "\"aerofoil\"", aerofoil_key, N_KEY, g, &given));
    UTW_TRY(check_given(r, given));
    if (given & NACA)
        UTW_TRY(utw_aerofoil_naca(g->naca, g->sharp, &xy, &g->foil.n, err));
    else
        UTW_TRY(read_list(r, g->points, &xy, &g->foil.n));
    g->foil.xy = xy;
    UTW_TRY(utw_aerofoil_part(&g->foil, part, err));
    st = UTW_OK;
done:
    if (g != NULL) {
        utw_free(g->naca);
        utw_free(g->points);
    }
    utw_free(g);
    utw_free(xy);
    return st;
}
