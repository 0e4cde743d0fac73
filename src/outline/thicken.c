/* SPDX-License-Identifier: GPL-3.0-or-later
 * Thickening a midline: every face of the graph of walls is walked along the walls' sides, and is
 * one loop. */
#include "outline/thicken.h"

#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/check_curve.h"
#include "outline/contact.h"
#include "outline/curvelist.h"
#include "outline/graph.h"
#include "outline/intersect.h"
#include "outline/joint.h"
#include "outline/side.h"

static const double FOLLOW =
    1e-9; /* of the size: how near cubics follow the side of a tapering arc */

typedef struct thicken {
    const utw_midline *midline;
    utw_path *path;   /* [n_walls], owned */
    utw_joint *joint; /* [2 n_walls], owned: at the end of each half-edge */
    int *next;        /* [2 n_walls], owned: the half-edge that goes on from each */
    double size;      /* of the midline [L] */
    utw_error *err;
} thicken;

/* Half-edge 2w runs along wall w, 2w + 1 back along it. Each is walked along its right side, so
 * that the material is to the left. */
static int wall_of(int half)
{
    return half / 2;
}

static utw_status at_wall(const thicken *x, int wall, utw_status st)
{
    utw_error_place(x->err, -1, -1, wall);
    return st;
}

#define FAIL(x, wall, ...) at_wall(x, wall, utw_fail((x)->err, UTW_E_OUTLINE, __VA_ARGS__))

/* ---- what cannot be thickened ---- */

static utw_status check_nodes(const thicken *x)
{
    const utw_midline *m = x->midline;
    for (int j = 1; j < m->n_nodes; j++)
        for (int i = 0; i < j; i++)
            if (fabs(m->nodes[i][0] - m->nodes[j][0]) <= UTW_TOUCH * x->size &&
                fabs(m->nodes[i][1] - m->nodes[j][1]) <= UTW_TOUCH * x->size)
                return FAIL(x, j,
                            "nodes %d and %d both lie at (%g, %g): a slit of no width cannot be "
                            "thickened; move them "
                            "apart by its width, or make them one node",
                            i, j, m->nodes[j][0], m->nodes[j][1]);
    return UTW_OK;
}

static utw_status check_thickness(const thicken *x, int i)
{
    const utw_wall *w = &x->midline->walls[i];
    const double thick = fmax(w->t0, w->t1), thin = fmin(w->t0, w->t1),
                 curvature = fabs(x->path[i].kappa);
    if (curvature * thick / 2 >= 1 - 1e-6)
        return FAIL(x, i,
                    "wall %d (node %d to node %d) is %g thick, too much for its arc of radius %g: "
                    "it must be less than "
                    "twice the radius",
                    i + 1, w->from, w->to, thick, 1 / curvature);
    if (thin < 2 * UTW_DETAIL * x->size)
        return FAIL(x, i,
                    "wall %d (node %d to node %d) is only %g thick, less than 2e-7 of the "
                    "section's size %g",
                    i + 1, w->from, w->to, thin, x->size);
    return UTW_OK;
}

static utw_status make_paths(thicken *x)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_midline *m = x->midline;
    utw_graph graph = {.n_nodes = 0};
    double origin[2];
    utw_error *err = x->err;
    UTW_TRY(utw_graph_paths(m, x->path, origin, &x->size, err));
    UTW_TRY(check_nodes(x));
    UTW_TRY(utw_graph_init(m, &graph, err));
    UTW_TRY(utw_contact_check(m, x->path, origin, x->size, err));
    for (int i = 0; i < m->n_walls; i++) {
        const utw_wall *w = &m->walls[i];
        utw_path *path = &x->path[i];
        /* in the drawing's own coordinates, so that round numbers stay round; an arc flatter than a
         * drawing can mean is a line */
        if (!w->arc || fabs(path->kappa) * x->size * UTW_FLAT < 1)
            *path = utw_path_line(m->nodes[w->from], m->nodes[w->to], w->t0, w->t1);
        else
            (void)utw_path_arc(m->nodes[w->from], w->mid, m->nodes[w->to], w->t0, w->t1, path);
        UTW_TRY(check_thickness(x, i));
    }
    st = UTW_OK;
done:
    utw_graph_clear(&graph);
    return st;
}

/* ---- the order of the walls around each node ---- */

typedef struct spoke {
    int node, half;     /* the half-edge that leaves the node */
    double angle, bend; /* of its tangent [rad]; curvature in the direction it leaves in */
} spoke;

static int compare_spokes(const void *left, const void *right)
{
    const spoke *a = left, *b = right;
    if (a->node != b->node) return a->node < b->node ? -1 : 1;
    if (fabs(a->angle - b->angle) > 1e-9) return a->angle < b->angle ? -1 : 1;
    if (a->bend != b->bend) return a->bend < b->bend ? -1 : 1;
    return a->half - b->half;
}

static spoke spoke_of(const thicken *x, int half)
{
    const utw_wall *w = &x->midline->walls[wall_of(half)];
    const utw_path *path = &x->path[wall_of(half)];
    const int back = half & 1;
    utw_path_point at;
    utw_path_at(path, back ? path->length : 0, &at);
    const double sign = back ? -1 : 1, angle = atan2(sign * at.e[1], sign * at.e[0]);
    /* -pi and pi are one direction */
    return (spoke){back ? w->to : w->from, half,
                   angle < -UTW_PI + 1e-9 ? angle + 2 * UTW_PI : angle, sign * path->kappa};
}

/* From the end of half-edge h the walk goes on along the half-edge counter-clockwise next to its
 * own way back. */
static utw_status order_walls(thicken *x)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    const int n = 2 * x->midline->n_walls;
    spoke *spokes = NULL;
    UTW_TRY_ALLOC(spokes = utw_alloc((size_t)n, sizeof *spokes));
    for (int h = 0; h < n; h++) spokes[h] = spoke_of(x, h);
    qsort(spokes, (size_t)n, sizeof *spokes, compare_spokes);
    for (int first = 0, last; first < n; first = last) {
        for (last = first; last < n && spokes[last].node == spokes[first].node;) last++;
        for (int i = first; i < last; i++) {
            const spoke *here = &spokes[i], *after = &spokes[i + 1 < last ? i + 1 : first];
            const double turn = after->angle - here->angle;
            x->next[here->half ^ 1] = after->half;
            x->joint[here->half ^ 1].wedge = i + 1 < last ? turn : turn + 2 * UTW_PI;
        }
    }
    st = UTW_OK;
done:
    utw_free(spokes);
    return st;
}

/* ---- joints ---- */

static utw_arm arm_of(const thicken *x, int half, int at_end)
{
    const utw_path *path = &x->path[wall_of(half)];
    const int back = half & 1;
    utw_arm arm = {.side = {path, back ? 1 : -1},
                   .station = (back == at_end) ? 0 : path->length,
                   .ahead = back == at_end ? 1 : -1};
    return arm;
}

static utw_status make_joints(thicken *x)
{
    for (int h = 0; h < 2 * x->midline->n_walls; h++) {
        const utw_wall *w = &x->midline->walls[wall_of(h)];
        const int g = x->next[h], node = h & 1 ? w->from : w->to;
        const utw_arm in = arm_of(x, h, 1), out = arm_of(x, g, 0);
        switch (utw_joint_make(&in, &out, g == (h ^ 1), x->midline->nodes[node],
                               UTW_TOUCH * x->size, UTW_DETAIL * x->size, &x->joint[h])) {
        case UTW_JOINT_MADE:
            break;
        case UTW_JOINT_TOO_SHARP:
            return FAIL(x, wall_of(g),
                        "walls %d and %d meet at node %d at too sharp an angle for their thickness "
                        "and length: %.3g "
                        "degrees",
                        wall_of(h) + 1, wall_of(g) + 1, node, x->joint[h].wedge * (180 / UTW_PI));
        case UTW_JOINT_TINY_STEP:
            return FAIL(x, wall_of(g),
                        "walls %d and %d differ in thickness at node %d by too little to be drawn; "
                        "give them the same "
                        "thickness there",
                        wall_of(h) + 1, wall_of(g) + 1, node);
        }
    }
    return UTW_OK;
}

/* Half-edge h from the joint before it to its own: both corners must leave something of its side.
 */
static utw_status check_side(const thicken *x, int before, int h)
{
    const utw_path *path = &x->path[wall_of(h)];
    const utw_wall *w = &x->midline->walls[wall_of(h)];
    const double s0 = x->joint[before].s_out, s1 = x->joint[h].s_in,
                 left = h & 1 ? s0 - s1 : s1 - s0;
    if (left > UTW_DETAIL * x->size) return UTW_OK;
    const double from = h & 1 ? s1 : s0, to = h & 1 ? path->length - s0 : path->length - s1;
    return FAIL(
        x, wall_of(h),
        "wall %d (node %d to node %d) is too short for the thicknesses at its ends: of its length "
        "%.6g the "
        "corners take %.6g at node %d and %.6g at node %d; lengthen it or make the walls thinner",
        wall_of(h) + 1, w->from, w->to, path->length, fmax(from, 0), w->from, fmax(to, 0), w->to);
}

/* ---- loops ---- */

/* One more curve for every wall side, one for the end face or step. */
static utw_status walk(thicken *x, int first, unsigned char *seen, utw_loop *loop)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    utw_fit fit = {.n = 0};
    int *vertex = NULL, before = first;
    size_t capacity = 0;
    while (x->next[before] != first) before = x->next[before]; /* next[] is a permutation */
    for (int h = first;; before = h, h = x->next[h]) {
        const utw_arm arm = arm_of(x, h, 0);
        const utw_joint *start = &x->joint[before], *end = &x->joint[h];
        seen[h] = 1;
        UTW_TRY(check_side(x, before, h));
        UTW_TRY(utw_side_curves(&arm.side, start->s_out, end->s_in, start->p[start->n - 1],
                                end->p[0], FOLLOW * x->size, &fit, err));
        if (end->n == 2) UTW_TRY(utw_fit_append(&fit, utw_curve_line(end->p[0], end->p[1]), err));
        void *array = vertex;
        if (utw_grow(&array, &capacity, fit.n, sizeof *vertex) != 0) {
            st = utw_fail(err, UTW_E_NOMEM, "out of memory (%zu curves)", fit.n);
            goto done;
        }
        vertex = array;
        for (size_t k = (size_t)loop->n; k < fit.n; k++) vertex[k] = wall_of(h);
        loop->n = (int)fit.n;
        if (x->next[h] == first) break;
    }
    *loop = (utw_loop){.n = (int)fit.n, .curve = fit.curve, .vertex = vertex};
    fit.curve = NULL;
    vertex = NULL;
    st = UTW_OK;
done:
    if (st != UTW_OK) loop->n = 0;
    utw_free(fit.curve);
    utw_free(vertex);
    return st;
}

/* A loop for every face, in the order of their first walls. */
static utw_status make_loops(thicken *x, utw_part *part)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    const int n = 2 * x->midline->n_walls;
    unsigned char *seen = NULL;
    UTW_TRY_ALLOC(seen = utw_alloc((size_t)n, sizeof *seen));
    UTW_TRY_ALLOC(part->loop = utw_alloc((size_t)n, sizeof *part->loop));
    for (int h = 0; h < n; h++)
        if (!seen[h]) UTW_TRY(walk(x, h, seen, &part->loop[part->n_loop++]));
    st = UTW_OK;
done:
    utw_free(seen);
    return st;
}

typedef struct apart {
    const thicken *x;
    const utw_curve_list *list;
    utw_status st;
} apart;

static int visit_pair(void *context, int i, int j)
{
    apart *a = context;
    const utw_curve_ref *p = &a->list->ref[i], *q = &a->list->ref[j];
    int shared = 0;
    utw_meeting m;
    if (p->index == q->index && (p->k + 1) % p->n == q->k) shared |= UTW_SHARED(1, 0);
    if (p->index == q->index && (q->k + 1) % q->n == p->k) shared |= UTW_SHARED(0, 1);
    const double tolerance = (shared ? UTW_TOUCH : UTW_DETAIL) * a->x->size;
    if (!utw_curves_meet(p->curve, q->curve, shared, tolerance, &m)) return 0;
    const int first = p->vertex < q->vertex ? p->vertex : q->vertex,
              second = p->vertex + q->vertex - first;
    if (first == second)
        a->st = FAIL(a->x, first,
                     "wall %d, thickened, runs into itself near (%.6g, %.6g); make it thinner or "
                     "change its course",
                     first + 1, m.at[0], m.at[1]);
    else
        a->st = FAIL(a->x, second,
                     "walls %d and %d, thickened, run into one another near (%.6g, %.6g); make "
                     "them thinner or move them "
                     "apart",
                     first + 1, second + 1, m.at[0], m.at[1]);
    return 1;
}

static utw_status check_apart(const thicken *x, utw_part *part)
{
    const utw_outline outline = {.n_part = 1, .part = part};
    utw_curve_list list = {.n = 0};
    utw_status st = utw_curve_list_init(&list, &outline, x->err);
    if (st != UTW_OK) return st;
    apart a = {x, &list, UTW_OK};
    if (utw_boxtree_pairs(&list.tree, UTW_DETAIL * x->size, visit_pair, &a)) st = a.st;
    utw_curve_list_clear(&list);
    return st;
}

/* The outer face, the only one that runs counter-clockwise, comes first. */
static utw_status order_loops(const thicken *x, utw_part *part)
{
    int outer = -1, n_outer = 0;
    for (int i = 0; i < part->n_loop; i++)
        if (utw_loop_area(&part->loop[i]) > 0) {
            outer = i;
            n_outer++;
        }
    /* Euler's formula gives the number of faces; anything else is no plane drawing */
    if (n_outer != 1 || part->n_loop != x->midline->n_walls - x->midline->n_nodes + 2)
        return utw_fail(x->err, UTW_E_OUTLINE,
                        "midline: its walls, thickened, fill one of its cells; make them thinner "
                        "or move them apart");
    const utw_loop outline = part->loop[outer];
    memmove(&part->loop[1], &part->loop[0], (size_t)outer * sizeof *part->loop);
    part->loop[0] = outline;
    return UTW_OK;
}

utw_status utw_thicken(const utw_midline *midline, utw_part *part, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_part made = {.material = -1};
    thicken x = {.midline = midline, .err = err};
    const int n = midline != NULL && midline->n_walls > 0 && midline->n_walls <= UTW_GRAPH_MAX
                      ? midline->n_walls
                      : 0;
    UTW_TRY_ALLOC(x.path = utw_alloc((size_t)n, sizeof *x.path));
    UTW_TRY_ALLOC(x.joint = utw_alloc((size_t)n * 2, sizeof *x.joint));
    UTW_TRY_ALLOC(x.next = utw_alloc((size_t)n * 2, sizeof *x.next));
    UTW_TRY(make_paths(&x));
    UTW_TRY(order_walls(&x));
    UTW_TRY(make_joints(&x));
    UTW_TRY(make_loops(&x, &made));
    UTW_TRY(check_apart(&x, &made));
    UTW_TRY(order_loops(&x, &made));
    *part = made;
    memset(&made, 0, sizeof made);
    st = UTW_OK;
done:
    utw_part_clear(&made);
    utw_free(x.path);
    utw_free(x.joint);
    utw_free(x.next);
    return st;
}
