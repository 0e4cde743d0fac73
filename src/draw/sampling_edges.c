/* SPDX-License-Identifier: GPL-3.0-or-later
 * Finding the edges of many triangles by their lower vertex. */
#include "draw/sampling_edges.h"

#include "base/memory.h"
#include "base/status.h"

/* Number the edges: those with the same lower vertex form a chain. */
static utw_status number_edges(utw_sampling *s, int *uses, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *head = NULL, *next = NULL;
    UTW_TRY_ALLOC(head = utw_alloc((size_t)s->n_vertex, sizeof *head));
    UTW_TRY_ALLOC(next = utw_alloc(3 * (size_t)s->n_tri, sizeof *next));
    for (int i = 0; i < s->n_vertex; i++) head[i] = -1;
    for (int t = 0; t < s->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const int a = s->tri[t][k], b = s->tri[t][(k + 1) % 3];
            const int low = a < b ? a : b, high = a < b ? b : a;
            int e = head[low];
            while (e >= 0 && s->edge[e][1] != high) e = next[e];
            if (e < 0) {
                e = s->n_edge++;
                s->edge[e][0] = low;
                s->edge[e][1] = high;
                next[e] = head[low];
                head[low] = e;
            }
            s->side[t][k] = e;
            uses[e]++;
        }
    st = UTW_OK;
done:
    utw_free(head);
    utw_free(next);
    return st;
}

/* Sides used once are on the boundary. */
static utw_status find_rim(utw_sampling *s, const int *uses, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *leaves = NULL, n = 0;
    for (int e = 0; e < s->n_edge; e++) {
        s->rim_of_edge[e] = -1;
        n += uses[e] == 1;
    }
    UTW_TRY_ALLOC(s->rim = utw_alloc((size_t)n, sizeof *s->rim));
    UTW_TRY_ALLOC(s->rim_edge = utw_alloc((size_t)n, sizeof *s->rim_edge));
    UTW_TRY_ALLOC(s->rim_next = utw_alloc((size_t)n, sizeof *s->rim_next));
    UTW_TRY_ALLOC(leaves = utw_alloc((size_t)s->n_vertex, sizeof *leaves));
    for (int t = 0; t < s->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const int e = s->side[t][k];
            if (uses[e] != 1) continue;
            const int r = s->n_rim++;
            s->rim[r][0] = s->tri[t][k];
            s->rim[r][1] = s->tri[t][(k + 1) % 3];
            s->rim_edge[r] = e;
            s->rim_of_edge[e] = r;
            leaves[s->rim[r][0]] = r;
        }
    for (int r = 0; r < s->n_rim; r++) s->rim_next[r] = leaves[s->rim[r][1]];
    st = UTW_OK;
done:
    utw_free(leaves);
    return st;
}

utw_status utw_sampling_edges(utw_sampling *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *uses = NULL;
    const size_t most = 3 * (size_t)s->n_tri;
    UTW_TRY_ALLOC(s->edge = utw_alloc(most, sizeof *s->edge));
    UTW_TRY_ALLOC(s->side = utw_alloc((size_t)s->n_tri, sizeof *s->side));
    UTW_TRY_ALLOC(uses = utw_alloc(most, sizeof *uses));
    UTW_TRY(number_edges(s, uses, err));
    UTW_TRY_ALLOC(s->rim_of_edge = utw_alloc((size_t)s->n_edge, sizeof *s->rim_of_edge));
    UTW_TRY(find_rim(s, uses, err));
    st = UTW_OK;
done:
    utw_free(uses);
    return st;
}
