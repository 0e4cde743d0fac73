/* SPDX-License-Identifier: GPL-3.0-or-later
 * From an outline to its thin-walled idealisation, or to the sentence why there is none. */
#include "thinwall/idealise.h"

#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "section/area.h"
#include "thinwall/assemble.h"
#include "thinwall/rate.h"

#define LEAST_LENGTH                                                                               \
    8.0                 /* of all walls together over their mean thickness, when none is slender   \
                         */
#define MOST_SHARE 0.6  /* of the area in corners and lumps */
#define AREA       0.1  /* difference of the areas from which a found midline is doubted */
#define LENGTH     0.25 /* the same of the lengths */

void utw_idealisation_free(utw_idealisation *i)
{
    if (i == NULL) return;
    utw_free(i->midline.nodes);
    utw_free(i->midline.walls);
    utw_free(i->wall);
    utw_free(i->faced);
    utw_thin_free(i->thin);
    utw_free(i);
}

const utw_midline *utw_idealisation_midline(const utw_idealisation *i)
{
    return &i->midline;
}

const utw_thin *utw_idealisation_thin(const utw_idealisation *i)
{
    return i->thin;
}

const utw_wall_info *utw_idealisation_wall(const utw_idealisation *i, int wall)
{
    return wall >= 0 && wall < i->midline.n_walls ? &i->wall[wall] : NULL;
}

const utw_idealisation_info *utw_idealisation_get(const utw_idealisation *i)
{
    return &i->info;
}

const char *utw_idealisation_doubt(const utw_idealisation *i)
{
    return i->doubt;
}

static utw_status find(utw_idealisation *ideal, const utw_outline *outline, double area,
                       double density, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_border *border = NULL;
    utw_chordal *chordal = NULL;
    utw_wall_kind *kind = NULL;
    utw_build build = {.err = err};
    UTW_TRY(utw_border_create(outline, density, &border, err));
    UTW_TRY(utw_chordal_create(border, &chordal, err));
    build.border = border;
    build.chordal = chordal;
    UTW_TRY(utw_assemble(&build));
    if (build.n_wall == 0) {
        const double *box = outline->box;
        st =
            utw_fail(err, UTW_E_NO_THIN_WALL,
                     "the section has no thin-walled idealisation: no part of it is clearly longer "
                     "than thick (width %.4g, height %.4g, area %.4g)",
                     box[2] - box[0], box[3] - box[1], area);
        goto done;
    }
    UTW_TRY(utw_build_finish(&build, &ideal->midline, &kind, &ideal->faced));
    UTW_TRY(utw_rate_walls(ideal, kind, err));
    ideal->info.holes = border->n_loop - 1;
    st = UTW_OK;
done:
    utw_build_clear(&build);
    utw_chordal_free(chordal);
    utw_border_free(border);
    utw_free(kind);
    return st;
}

/* A sentence with the figures when the walls are none to speak of: no slender one, and all together
 * short against their thickness; or most of the section is no wall. */
static utw_status check_sense(const utw_idealisation *ideal, utw_error *err)
{
    const utw_idealisation_info *info = &ideal->info;
    if (info->slenderness < UTW_SLENDER * (1 - 1e-9) &&
        info->length < LEAST_LENGTH * info->thickness)
        return utw_fail(
            err, UTW_E_NO_THIN_WALL,
            "the section has no thin-walled idealisation: its most slender wall is %.3g "
            "times as long as thick (at least %g times is needed), and all walls "
            "together are %.3g times as long as thick on average",
            info->slenderness, UTW_SLENDER, info->length / info->thickness);
    if (info->area_share > MOST_SHARE)
        return utw_fail(
            err, UTW_E_NO_THIN_WALL,
            "the section has no thin-walled idealisation: only %.2g %% of its area lies "
            "between the two faces of a wall; at least %g %% is needed",
            100 * (1 - info->area_share), 100 * (1 - MOST_SHARE));
    return UTW_OK;
}

static utw_status solve(utw_idealisation *ideal, utw_error *err)
{
    utw_error inner;
    const utw_status st = utw_thin_solve(&ideal->midline, &ideal->thin, &inner);
    if (st == UTW_OK) return st;
    if (st == UTW_E_NOMEM) return utw_fail(err, st, "%s", inner.text);
    return utw_fail(err, UTW_E_NO_THIN_WALL,
                    "the section has no thin-walled idealisation: the walls found in it make no "
                    "midline (%s)",
                    inner.text);
}

/* The midline a section was drawn by. A corner takes half the thickest other wall from each wall
 * that ends in it. */
static utw_status take(utw_idealisation *ideal, const utw_midline *m, int holes, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_midline *copy = &ideal->midline;
    UTW_TRY_ALLOC(copy->nodes = utw_alloc((size_t)m->n_nodes, sizeof *copy->nodes));
    UTW_TRY_ALLOC(copy->walls = utw_alloc((size_t)m->n_walls, sizeof *copy->walls));
    UTW_TRY_ALLOC(ideal->faced = utw_alloc((size_t)m->n_walls, sizeof *ideal->faced));
    memcpy(copy->nodes, m->nodes, (size_t)m->n_nodes * sizeof *m->nodes);
    memcpy(copy->walls, m->walls, (size_t)m->n_walls * sizeof *m->walls);
    copy->n_nodes = m->n_nodes;
    copy->n_walls = m->n_walls;
    UTW_TRY(utw_rate_walls(ideal, NULL, err));
    ideal->info.given = 1;
    ideal->info.holes = holes;
    for (int i = 0; i < m->n_walls; i++) {
        ideal->faced[i] = ideal->wall[i].length;
        for (int e = 0; e < 2; e++) {
            const int node = e == 0 ? m->walls[i].from : m->walls[i].to;
            double thickest = 0;
            for (int k = 0; k < m->n_walls; k++) {
                if (k == i) continue;
                if (m->walls[k].from == node) thickest = fmax(thickest, m->walls[k].t0);
                if (m->walls[k].to == node) thickest = fmax(thickest, m->walls[k].t1);
            }
            ideal->faced[i] = fmax(0, ideal->faced[i] - 0.5 * thickest);
        }
    }
    st = UTW_OK;
done:
    return st;
}

static void share_of_corners(utw_idealisation *ideal, double area)
{
    double faced = 0;
    for (int i = 0; i < ideal->midline.n_walls; i++)
        if (ideal->wall[i].kind != UTW_WALL_LUMP)
            faced += ideal->faced[i] * ideal->wall[i].thickness;
    ideal->info.area_share = fmax(0, 1 - faced / area);
}

/* Half the width of the free ends: what the boundary has beyond twice the walls' length. */
static double half_ends(const utw_midline *m)
{
    double sum = 0;
    for (int i = 0; i < m->n_walls; i++)
        for (int e = 0; e < 2; e++) {
            const int node = e == 0 ? m->walls[i].from : m->walls[i].to;
            int degree = 0;
            for (int k = 0; k < m->n_walls; k++)
                degree += (m->walls[k].from == node) + (m->walls[k].to == node);
            if (degree == 1) sum += 0.5 * (e == 0 ? m->walls[i].t0 : m->walls[i].t1);
        }
    return sum;
}

/* The midline against the section: its area, its length, its cells. */
static void check_against_outline(utw_idealisation *ideal, const utw_area *area)
{
    utw_idealisation_info *info = &ideal->info;
    info->area_error = info->length * info->thickness / area->A - 1;
    info->length_error = (info->length + half_ends(&ideal->midline)) / (0.5 * area->perimeter) - 1;
    if (info->cells != info->holes)
        snprintf(ideal->doubt, sizeof ideal->doubt,
                 "The midline has %d %s and the section %d %s: do not trust it.", info->cells,
                 info->cells == 1 ? "cell" : "cells", info->holes,
                 info->holes == 1 ? "hole" : "holes");
    else if (fabs(info->area_error) > AREA)
        snprintf(ideal->doubt, sizeof ideal->doubt,
                 "The midline does not represent this section well: its area is %.3g %% %s "
                 "than the section's.",
                 100 * fabs(info->area_error), info->area_error > 0 ? "greater" : "smaller");
    else if (fabs(info->length_error) > LENGTH)
        snprintf(ideal->doubt, sizeof ideal->doubt,
                 "The midline does not represent this section well: its walls are %.3g %% %s "
                 "than half the boundary is long.",
                 100 * fabs(info->length_error), info->length_error > 0 ? "longer" : "shorter");
}

/* Holes of all parts together: a part may fill the hole of another. */
static utw_status count_holes(const utw_outline *outline, int *holes, utw_error *err)
{
    utw_border *border = NULL;
    *holes = outline->part[0].n_loop - 1;
    if (outline->n_part == 1) return UTW_OK;
    const utw_status st = utw_border_create(outline, 1, &border, err);
    if (st == UTW_OK) *holes = border->n_loop - 1;
    utw_border_free(border);
    return st;
}

static utw_status idealise(const utw_outline *outline, const utw_midline *midline, double density,
                           int must_make_sense, utw_idealisation **idealisation, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_idealisation *ideal = NULL;
    utw_area area;
    int holes = 0;
    UTW_TRY_ALLOC(ideal = utw_alloc(1, sizeof *ideal));
    UTW_TRY(utw_area_compute(outline, NULL, &area, err));
    if (midline != NULL) {
        UTW_TRY(count_holes(outline, &holes, err));
        UTW_TRY(take(ideal, midline, holes, err));
    } else {
        UTW_TRY(find(ideal, outline, area.A, density, err));
    }
    share_of_corners(ideal, area.A);
    check_against_outline(ideal, &area);
    if (must_make_sense) UTW_TRY(check_sense(ideal, err));
    UTW_TRY(solve(ideal, err));
    *idealisation = ideal;
    ideal = NULL;
    st = UTW_OK;
done:
    utw_idealisation_free(ideal);
    return st;
}

utw_status utw_idealise_with(const utw_outline *outline, double density,
                             utw_idealisation **idealisation, utw_error *err)
{
    if (outline == NULL || idealisation == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_idealise: outline and idealisation must not be NULL");
    return idealise(outline, utw_outline_midline(outline), density, 1, idealisation, err);
}

utw_status utw_idealise(const utw_outline *outline, utw_idealisation **idealisation, utw_error *err)
{
    return utw_idealise_with(outline, 1, idealisation, err);
}

utw_status utw_idealise_as(const utw_outline *outline, const utw_midline *midline,
                           utw_idealisation **idealisation, utw_error *err)
{
    utw_thin *thin = NULL;
    if (outline == NULL || midline == NULL || idealisation == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_idealise_as: outline, midline and idealisation must not be NULL");
    /* it is checked before its walls are rated */
    const utw_status st = utw_thin_solve(midline, &thin, err);
    utw_thin_free(thin);
    return st == UTW_OK ? idealise(outline, midline, 1, 1, idealisation, err) : st;
}

utw_status utw_idealise_given(const utw_outline *outline, const utw_midline *midline,
                              utw_idealisation **idealisation, utw_error *err)
{
    return idealise(outline, midline, 1, 0, idealisation, err);
}
