/* SPDX-License-Identifier: GPL-3.0-or-later
 * The comparison in the report for programs. */
#include "report/json_writer.h"

static const char *base_key(utw_difference_base base)
{
    switch (base) {
    case UTW_OF_SOLID:
        return "solid";
    case UTW_OF_WIDTH:
        return "width";
    case UTW_OF_DEPTH:
        return "depth";
    case UTW_OF_MEAN:
        return "sqrt(Ixx Iyy)";
    }
    return "";
}

static const char *kind_key(utw_wall_kind kind)
{
    switch (kind) {
    case UTW_WALL_PLATE:
        return "plate";
    case UTW_WALL_BEND:
        return "bend";
    case UTW_WALL_LUMP:
        return "lump";
    case UTW_WALL_LINK:
        return "link";
    }
    return "";
}

static void add_quantities(utw_json_writer *w, cJSON *to)
{
    const utw_comparison *c = w->report->comparison;
    cJSON *all = utw_json_add_object(w, to, "quantities");
    for (int k = 0; k < utw_comparison_count(c); k++) {
        const utw_compared *row = utw_comparison_get(c, k);
        cJSON *one = utw_json_add_object(w, all, utw_constant_key(row->which));
        if (row->absent != NULL) {
            utw_json_kept(w, cJSON_AddNullToObject(one, "difference"));
            utw_json_add_text(w, one, "reason", row->absent);
            continue;
        }
        utw_json_add_number(w, one, "solid", row->solid.value);
        utw_json_add_number(w, one, "low", row->solid.low);
        utw_json_add_number(w, one, "high", row->solid.high);
        utw_json_add_number(w, one, "thin", row->thin);
        utw_json_add_number(w, one, "difference", row->difference);
        utw_json_add_text(w, one, "of", base_key(row->base));
        utw_json_add_flag(w, one, "within", row->within);
    }
}

/* As a section file may hold it. */
static void add_midline(utw_json_writer *w, cJSON *to, const utw_midline *m)
{
    cJSON *midline = utw_json_add_object(w, to, "midline");
    cJSON *nodes = utw_json_add_array(w, midline, "nodes");
    for (int i = 0; i < m->n_nodes; i++) utw_json_add_point(w, nodes, NULL, m->nodes[i]);
    cJSON *walls = utw_json_add_array(w, midline, "walls");
    for (int i = 0; i < m->n_walls; i++) {
        const utw_wall *wall = &m->walls[i];
        cJSON *one = utw_json_append_object(w, walls);
        utw_json_add_number(w, one, "from", wall->from);
        utw_json_add_number(w, one, "to", wall->to);
        if (wall->t0 == wall->t1)
            utw_json_add_number(w, one, "t", wall->t0);
        else {
            cJSON *t = utw_json_add_array(w, one, "t");
            utw_json_append_number(w, t, wall->t0);
            utw_json_append_number(w, t, wall->t1);
        }
        if (wall->arc) utw_json_add_point(w, one, "arc", wall->mid);
    }
}

static void add_slenderness(utw_json_writer *w, cJSON *to, const utw_idealisation *ideal)
{
    cJSON *all = utw_json_add_array(w, to, "slenderness");
    const utw_wall_info *info;
    for (int i = 0; (info = utw_idealisation_wall(ideal, i)) != NULL; i++) {
        cJSON *one = utw_json_append_object(w, all);
        utw_json_add_text(w, one, "kind", kind_key(info->kind));
        utw_json_add_number(w, one, "length", info->length);
        utw_json_add_number(w, one, "thickness", info->thickness);
        utw_json_add_number(w, one, "slenderness", info->slenderness);
        utw_json_add_flag(w, one, "slender", info->slender);
    }
}

static void add_reasons(utw_json_writer *w, cJSON *to)
{
    const utw_comparison *c = w->report->comparison;
    cJSON *all = utw_json_add_array(w, to, "reasons");
    for (int k = 0; k < utw_comparison_reason_count(c); k++) {
        cJSON *item = utw_json_kept(w, cJSON_CreateString(utw_comparison_reason(c, k)));
        if (item == NULL || cJSON_AddItemToArray(all, item)) continue;
        w->failed = 1;
        cJSON_Delete(item);
    }
}

static void add_study(utw_json_writer *w, cJSON *to)
{
    const utw_study *s = w->report->study;
    if (s == NULL) return;
    cJSON *study = utw_json_add_object(w, to, "study");
    cJSON *steps = utw_json_add_array(w, study, "steps");
    for (int i = 0; i < utw_study_count(s); i++) {
        const utw_study_step *step = utw_study_get(s, i);
        cJSON *one = utw_json_append_object(w, steps);
        utw_json_add_number(w, one, "factor", step->factor);
        utw_json_add_number(w, one, "thickness", step->thickness);
        utw_json_add_number(w, one, "ratio", step->ratio);
        if (step->failed != NULL) {
            utw_json_add_text(w, one, "reason", step->failed);
            continue;
        }
        cJSON *difference = utw_json_add_object(w, one, "difference");
        for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
            double d;
            if (utw_study_difference(s, i, (utw_constant)k, &d))
                utw_json_add_number(w, difference, utw_constant_key((utw_constant)k), d);
        }
    }
    cJSON *limits = utw_json_add_object(w, study, "limits");
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        const char *statement = utw_study_statement(s, (utw_constant)k);
        if (statement != NULL)
            utw_json_add_text(w, limits, utw_constant_key((utw_constant)k), statement);
    }
}

void utw_json_add_comparison(utw_json_writer *w, cJSON *root)
{
    const utw_comparison *c = w->report->comparison;
    if (c == NULL) return;
    const utw_idealisation *ideal = utw_comparison_idealisation(c);
    const utw_idealisation_info *info = utw_idealisation_get(ideal);
    cJSON *compare = utw_json_add_object(w, root, "compare");
    utw_json_add_number(w, compare, "limit", utw_comparison_limit(c));
    utw_json_add_text(w, compare, "verdict", utw_comparison_verdict(c));
    utw_json_add_text(w, compare, "doubt", utw_idealisation_doubt(ideal));
    add_reasons(w, compare);
    utw_json_add_flag(w, compare, "given", info->given);
    utw_json_add_number(w, compare, "walls", info->walls);
    utw_json_add_number(w, compare, "bends", info->bends);
    utw_json_add_number(w, compare, "links", info->links);
    utw_json_add_number(w, compare, "lumps", info->lumps);
    utw_json_add_number(w, compare, "junctions", info->junctions);
    utw_json_add_number(w, compare, "cells", info->cells);
    utw_json_add_number(w, compare, "area_share", info->area_share);
    utw_json_add_number(w, compare, "area_error", info->area_error);
    utw_json_add_number(w, compare, "length_error", info->length_error);
    add_quantities(w, compare);
    add_midline(w, compare, utw_idealisation_midline(ideal));
    add_slenderness(w, compare, ideal);
    add_study(w, compare);
}
