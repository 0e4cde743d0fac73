/* SPDX-License-Identifier: GPL-3.0-or-later
 * All load cases of an outline at once. */
#include "section/cases.h"

#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "base/status.h"

void utw_cases_free(utw_cases *c)
{
    if (c == NULL) return;
    for (int i = 0; c->list != NULL && i < c->n; i++) utw_free(c->list[i].point);
    utw_free(c->list);
    utw_free(c->probe);
    utw_free(c);
}

/* Index of a case by its name; -1 after a message. */
static int case_of(const utw_outline *o, const char *name, utw_error *err)
{
    const char *known[64];
    int n = 0;
    for (int i = 0; i < o->n_load; i++) {
        if (strcmp(o->load[i].name, name) == 0) return i;
        if (n < 64) known[n++] = o->load[i].name;
    }
    const int near = utw_nearest_word(name, known, n);
    if (o->n_load == 0)
        utw_fail(err, UTW_E_LOAD, "there is no load case \"%.100s\": the section has no \"loads\"",
                 name);
    else if (near >= 0)
        utw_fail(err, UTW_E_LOAD, "there is no load case \"%.100s\"; did you mean \"%.100s\"?",
                 name, known[near]);
    else
        utw_fail(err, UTW_E_LOAD, "there is no load case \"%.100s\"; the first is \"%.100s\"", name,
                 known[0]);
    return -1;
}

/* The chosen cases, each once, in the order of the file. */
static utw_status choose(utw_cases *c, const utw_outline *o, int n, const char *const *name,
                         utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *chosen;
    UTW_TRY_ALLOC(chosen = utw_alloc((size_t)o->n_load, 1));
    if (n == 0) memset(chosen, 1, (size_t)o->n_load);
    for (int i = 0; i < n; i++) {
        const int at = case_of(o, name[i], err);
        if (at < 0) {
            st = UTW_E_LOAD;
            goto done;
        }
        chosen[at] = 1;
    }
    UTW_TRY_ALLOC(c->list = utw_alloc((size_t)o->n_load, sizeof *c->list));
    for (int i = 0; i < o->n_load; i++) {
        if (!chosen[i]) continue;
        c->list[c->n].name = utw_outline_load(o, i, &c->list[c->n].forces);
        c->n++;
    }
    st = UTW_OK;
done:
    utw_free(chosen);
    return st;
}

/* What is wrong with a load is noted with its case; a probe outside, or memory, ends it all. */
static utw_status compute(utw_cases *c, utw_case *one, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error why;
    one->status = utw_stress_peaks_of(c->stress, &one->forces, &one->peaks, &why);
    if (one->status == UTW_E_MATERIAL || one->status == UTW_E_LOAD) {
        snprintf(one->why, sizeof one->why, "%.255s", why.text);
        return UTW_OK;
    }
    if (one->status != UTW_OK) return utw_fail(err, one->status, "%s", why.text);
    UTW_TRY_ALLOC(one->point = utw_alloc((size_t)c->n_probe, sizeof *one->point));
    for (int k = 0; k < c->n_probe; k++)
        UTW_TRY(utw_stress_at(c->stress, &one->forces, c->probe[k], &one->point[k], err));
    c->n_done++;
    st = UTW_OK;
done:
    return st;
}

static utw_status envelope(utw_cases *c, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_stress_peaks *peaks = NULL;
    int *which = NULL, n = 0;
    UTW_TRY_ALLOC(peaks = utw_alloc((size_t)c->n, sizeof *peaks));
    UTW_TRY_ALLOC(which = utw_alloc((size_t)c->n, sizeof *which));
    for (int i = 0; i < c->n; i++) {
        if (c->list[i].status != UTW_OK) continue;
        peaks[n] = c->list[i].peaks;
        which[n++] = i;
    }
    if (n > 0) {
        UTW_TRY(utw_stress_envelope_of(n, peaks, &c->envelope, err));
        for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++)
            c->envelope.governing[k] = which[c->envelope.governing[k]];
        if (c->envelope.margin_case >= 0) c->envelope.margin_case = which[c->envelope.margin_case];
    }
    st = UTW_OK;
done:
    utw_free(peaks);
    utw_free(which);
    return st;
}

/* A probe must lie in the section whatever the loads are. */
static utw_status check_probes(const utw_cases *c, utw_error *err)
{
    const utw_forces none = {0};
    utw_stress_point point;
    utw_status st = UTW_OK;
    for (int k = 0; k < c->n_probe && st == UTW_OK; k++)
        st = utw_stress_at(c->stress, &none, c->probe[k], &point, err);
    return st;
}

utw_status utw_cases_create(const utw_stress *stress, int n_name, const char *const *name,
                            int n_probe, const double (*probe)[2], utw_cases **cases,
                            utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_cases *c = NULL;
    if (stress == NULL || cases == NULL || n_name < 0 || n_probe < 0 ||
        (n_name > 0 && name == NULL) || (n_probe > 0 && probe == NULL))
        return utw_fail(err, UTW_E_ARGUMENT, "utw_cases_create: wrong arguments");
    UTW_TRY_ALLOC(c = utw_alloc(1, sizeof *c));
    c->stress = stress;
    UTW_TRY(choose(c, stress->unit.solution->outline, n_name, name, err));
    UTW_TRY_ALLOC(c->probe = utw_alloc((size_t)n_probe, sizeof *c->probe));
    c->n_probe = n_probe;
    if (n_probe > 0) memcpy(c->probe, probe, (size_t)n_probe * sizeof *c->probe);
    UTW_TRY(check_probes(c, err));
    for (int i = 0; i < c->n; i++) UTW_TRY(compute(c, &c->list[i], err));
    UTW_TRY(envelope(c, err));
    *cases = c;
    c = NULL;
    st = UTW_OK;
done:
    utw_cases_free(c);
    return st;
}

int utw_cases_count(const utw_cases *c)
{
    return c->n;
}

utw_status utw_cases_get(const utw_cases *c, int k, const char **name, utw_forces *forces,
                         utw_stress_peaks *peaks, utw_error *err)
{
    if (c == NULL || k < 0 || k >= c->n)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_cases_get: no such load case");
    const utw_case *one = &c->list[k];
    if (name != NULL) *name = one->name;
    if (forces != NULL) *forces = one->forces;
    if (one->status != UTW_OK) return utw_fail(err, one->status, "%s", one->why);
    if (peaks != NULL) *peaks = one->peaks;
    return UTW_OK;
}

utw_status utw_cases_probe(const utw_cases *c, int k, int probe, utw_stress_point *point,
                           utw_error *err)
{
    if (c == NULL || point == NULL || k < 0 || k >= c->n || probe < 0 || probe >= c->n_probe)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_cases_probe: no such load case or probe");
    const utw_case *one = &c->list[k];
    if (one->status != UTW_OK) return utw_fail(err, one->status, "%s", one->why);
    *point = one->point[probe];
    return UTW_OK;
}

utw_status utw_cases_envelope(const utw_cases *c, utw_stress_envelope *result, utw_error *err)
{
    if (c == NULL || result == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_cases_envelope: arguments must not be NULL");
    if (c->n_done == 0) return utw_fail(err, UTW_E_LOAD, "there is no load case with a result");
    *result = c->envelope;
    return UTW_OK;
}
