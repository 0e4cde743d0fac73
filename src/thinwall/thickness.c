/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thickness study: both theories as the walls of a midline grow thicker. */
#include "thinwall/thickness.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "outline/outline.h"
#include "thinwall/compare.h"

#define LEAST_FACTOR 1e-3
#define MOST_FACTOR  1e3

void utw_study_free(utw_study *s)
{
    if (s == NULL) return;
    for (int k = 0; k < UTW_COMPARED; k++) utw_free(s->statement[k]);
    utw_free(s->step);
    utw_free(s);
}

int utw_study_count(const utw_study *s)
{
    return s->n;
}

const utw_study_step *utw_study_get(const utw_study *s, int step)
{
    return step >= 0 && step < s->n ? &s->step[step].open : NULL;
}

double utw_study_limit(const utw_study *s)
{
    return s->limit;
}

int utw_study_difference(const utw_study *s, int step, utw_constant which, double *difference)
{
    const int k = utw_compared_index(which);
    if (step < 0 || step >= s->n || k < 0 || !isfinite(s->step[step].difference[k])) return 0;
    *difference = s->step[step].difference[k];
    return 1;
}

const char *utw_study_statement(const utw_study *s, utw_constant which)
{
    const int k = utw_compared_index(which);
    return k < 0 ? NULL : s->statement[k];
}

/* ---- one step ---- */

static utw_status copy_text(const char *from, char **to, utw_error *err)
{
    *to = utw_alloc(strlen(from) + 1, 1);
    if (*to == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    memcpy(*to, from, strlen(from) + 1);
    return UTW_OK;
}

/* The material of the section, when it has one for all parts. */
static utw_status take_material(const utw_outline *from, utw_outline *to, utw_error *err)
{
    const int m = from->part[0].material;
    for (int p = 0; p < from->n_part; p++)
        if (from->part[p].material != m) return UTW_OK;
    if (m < 0) return UTW_OK;
    to->material = utw_alloc(1, sizeof *to->material);
    if (to->material == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    to->material[0] = from->material[m];
    to->material[0].name = NULL;
    to->n_material = 1;
    to->part[0].material = 0;
    return copy_text(from->material[m].name, &to->material[0].name, err);
}

static utw_status compare_step(utw_study *s, int i, const utw_outline *section,
                               const utw_midline *scaled, const utw_options *options,
                               utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_outline *outline = NULL;
    utw_solution *solution = NULL;
    utw_idealisation *ideal = NULL;
    utw_comparison *comparison = NULL;
    UTW_TRY(utw_outline_from_midline(scaled, utw_outline_units(section), &outline, err));
    UTW_TRY(take_material(section, outline, err));
    UTW_TRY(utw_idealise_given(outline, scaled, &ideal, err));
    UTW_TRY(utw_solve(outline, options, &solution, err));
    UTW_TRY(utw_compare(solution, ideal, s->limit, &comparison, err));
    for (int k = 0; k < UTW_COMPARED; k++) {
        const utw_compared *row = &comparison->row[k];
        if (row->absent == NULL) s->step[i].difference[k] = row->difference;
    }
    st = UTW_OK;
done:
    utw_comparison_free(comparison);
    utw_solution_free(solution);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
    return st;
}

/* Walls that cannot have that thickness, or no solution: the step says so and the study goes on. */
static int is_of_the_step(utw_status st)
{
    return st == UTW_E_OUTLINE || st == UTW_E_MESH || st == UTW_E_SINGULAR;
}

static utw_status run_step(utw_study *s, int i, const utw_outline *section,
                           const utw_midline *midline, const utw_options *options, utw_error *err)
{
    utw_error inner;
    utw_step *step = &s->step[i];
    utw_midline scaled = *midline;
    for (int k = 0; k < UTW_COMPARED; k++) step->difference[k] = NAN;
    scaled.walls = utw_alloc((size_t)midline->n_walls, sizeof *scaled.walls);
    if (scaled.walls == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int w = 0; w < midline->n_walls; w++) {
        scaled.walls[w] = midline->walls[w];
        scaled.walls[w].t0 *= step->open.factor;
        scaled.walls[w].t1 *= step->open.factor;
    }
    const utw_status st = compare_step(s, i, section, &scaled, options, &inner);
    utw_free(scaled.walls);
    if (st == UTW_OK) return st;
    if (!is_of_the_step(st)) return utw_fail(err, st, "%s", inner.text);
    memcpy(step->why, inner.text, sizeof step->why);
    step->open.failed = step->why;
    return UTW_OK;
}

/* ---- the study ---- */

/* The plate that is longest for its thickness [L]. */
static double longest_plate(const utw_idealisation *ideal)
{
    double length = 0;
    for (int i = 0; i < ideal->midline.n_walls; i++) {
        const utw_wall_info *w = &ideal->wall[i];
        if (w->kind == UTW_WALL_PLATE) length = fmax(length, w->plate_length);
    }
    return length > 0 ? length : ideal->info.length;
}

static utw_status write_statements(utw_study *s, const char *unit, utw_error *err)
{
    for (int k = 0; k < UTW_COMPARED; k++) {
        utw_text text = {.text = NULL};
        utw_statement_write(s, k, unit, &text);
        if (text.n == 0 && !text.out_of_memory) continue;
        const utw_status st = utw_text_take(&text, &s->statement[k], err);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

static utw_status check(const utw_study_range *r, double limit, utw_error *err)
{
    if (!(r->from >= LEAST_FACTOR && r->to <= MOST_FACTOR && r->from < r->to) || r->steps < 2 ||
        r->steps > UTW_MOST_STEPS)
        return utw_fail(
            err, UTW_E_ARGUMENT,
            "the thickness study from %g to %g in %d steps: the factors must rise from at "
            "least %g to at most %g, in 2 to %d steps",
            r->from, r->to, r->steps, LEAST_FACTOR, MOST_FACTOR, UTW_MOST_STEPS);
    if (!(limit > 0 && limit <= 1))
        return utw_fail(err, UTW_E_ARGUMENT, "the limit %g is not between 0 and 1", limit);
    return UTW_OK;
}

utw_status utw_thickness_study(const utw_outline *outline, const utw_idealisation *ideal,
                               const utw_options *options, const utw_study_range *range,
                               double limit, utw_study **study, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_study *s = NULL;
    int done_steps = 0;
    if (outline == NULL || ideal == NULL || range == NULL || study == NULL)
        return utw_fail(
            err, UTW_E_ARGUMENT,
            "utw_thickness_study: outline, idealisation, range and study must not be NULL");
    UTW_TRY(check(range, limit, err));
    UTW_TRY_ALLOC(s = utw_alloc(1, sizeof *s));
    UTW_TRY_ALLOC(s->step = utw_alloc((size_t)range->steps, sizeof *s->step));
    s->n = range->steps;
    s->limit = limit;
    const double b = longest_plate(ideal);
    for (int i = 0; i < s->n; i++) {
        utw_study_step *open = &s->step[i].open;
        open->factor = range->from + (range->to - range->from) * i / (s->n - 1);
        open->thickness = open->factor * ideal->info.thickness;
        open->ratio = open->thickness / b;
        UTW_TRY(run_step(s, i, outline, &ideal->midline, options, err));
        done_steps += open->failed == NULL;
    }
    if (done_steps == 0) {
        st = utw_fail(err, UTW_E_NO_THIN_WALL,
                      "the midline cannot be given a thickness at any step of the study: %.300s",
                      s->step[0].why);
        goto done;
    }
    UTW_TRY(write_statements(s, outline->length_unit, err));
    *study = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_study_free(s);
    return st;
}
