/* SPDX-License-Identifier: GPL-3.0-or-later
 * Gmsh's triangulation of the chords, and finding the curves again in what it returns. */
#include "mesh/triangulate.h"

#include <gmshc.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/sizes.h"

enum { LINE_TYPE = 1, TRIANGLE_TYPE = 2 }; /* Gmsh's numbers for elements of two and three nodes */

/* One side of an element on a curve: points a, b of the list below, interval of the division. */
typedef struct chord {
    int a, b, edge;
    double t0, t1;
} chord;

/* Everything on the boundary, in the order it is given to Gmsh: points 0.. are the net's nodes,
 * then the inner breakpoints edge by edge; chords edge by edge. Gmsh's tags are one more. */
typedef struct boundary {
    const utw_net *net;
    const utw_division *division;
    int n_point, n_chord;
    double (*xy)[2], *size;
    double growth; /* of the size inside */
    chord *chord;
    int *first_chord; /* [n_edge + 1] */
    int *first_line;  /* [n_edge + 1] Gmsh's lines of every edge */
} boundary;

static void boundary_clear(boundary *b)
{
    utw_free(b->xy);
    utw_free(b->size);
    utw_free(b->chord);
    utw_free(b->first_chord);
    utw_free(b->first_line);
}

static utw_status boundary_fill(boundary *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_net *net = b->net;
    const utw_division *d = b->division;
    const size_t total = (size_t)(net->n_node + d->first[net->n_edge]);
    UTW_TRY_ALLOC(b->xy = utw_alloc(total, sizeof *b->xy));
    UTW_TRY_ALLOC(b->size = utw_alloc(total, sizeof *b->size));
    UTW_TRY_ALLOC(b->chord = utw_alloc(total, sizeof *b->chord));
    UTW_TRY_ALLOC(b->first_chord = utw_alloc((size_t)net->n_edge + 1, sizeof(int)));
    for (; b->n_point < net->n_node; b->n_point++)
        for (int k = 0; k < 2; k++) b->xy[b->n_point][k] = net->node[b->n_point][k];
    for (int e = 0; e < net->n_edge; e++) {
        const double *t = d->t + d->first[e];
        const int n = d->first[e + 1] - d->first[e] - 1;
        b->first_chord[e] = b->n_chord;
        for (int i = 0, last = net->edge[e].from; i < n; i++) {
            int next = net->edge[e].to;
            if (i < n - 1) {
                next = b->n_point++;
                utw_curve_point(&net->edge[e].curve, t[i + 1], b->xy[next]);
            }
            b->chord[b->n_chord++] = (chord){last, next, e, t[i], t[i + 1]};
            last = next;
        }
    }
    b->first_chord[net->n_edge] = b->n_chord;
    for (int i = 0; i < b->n_point; i++) b->size[i] = UTW_INFINITY;
    for (int i = 0; i < b->n_chord;
         i++) { /* at a point between two sides the size of the shorter one */
        const chord *c = &b->chord[i];
        const double length = utw_distance(b->xy[c->a], b->xy[c->b]);
        b->size[c->a] = fmin(b->size[c->a], length);
        b->size[c->b] = fmin(b->size[c->b], length);
    }
    st = UTW_OK;
done:
    return st;
}

/* ---- talking to Gmsh
 * ----------------------------------------------------------------------------- */

static utw_status gmsh_failed(utw_error *err, const char *what)
{
    return utw_fail(err, UTW_E_MESH,
                    "the mesher could not %s; check the outline for walls of almost no thickness",
                    what);
}

/* What Gmsh has as curves: a straight edge of the net with all its sides as one line, each side of
 * a curved edge as a line of its own (a line's nodes must lie on it). Lines of edge e have the tags
 * first_line[e] .. first_line[e+1] - 1. */
static int is_straight(const boundary *b, int edge)
{
    return b->net->edge[edge].curve.kind == UTW_LINE;
}

static int sides_of(const boundary *b, int edge)
{
    return b->first_chord[edge + 1] - b->first_chord[edge];
}

static utw_status give_lines(boundary *b, utw_error *err)
{
    int ierr = 0, tag = 1;
    if ((b->first_line = utw_alloc((size_t)b->net->n_edge + 1, sizeof(int))) == NULL)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int i = 0; i < b->net->n_node && !ierr; i++)
        gmshModelGeoAddPoint(b->xy[i][0], b->xy[i][1], 0, b->size[i], i + 1, &ierr);
    for (int e = 0; e < b->net->n_edge && !ierr; e++) {
        b->first_line[e] = tag;
        const chord *c = b->chord + b->first_chord[e];
        const int n = sides_of(b, e);
        for (int i = 0; i + 1 < n && !is_straight(b, e) && !ierr; i++)
            gmshModelGeoAddPoint(b->xy[c[i].b][0], b->xy[c[i].b][1], 0, b->size[c[i].b], c[i].b + 1,
                                 &ierr);
        if (is_straight(b, e) && !ierr)
            gmshModelGeoAddLine(c[0].a + 1, c[n - 1].b + 1, tag++, &ierr);
        for (int i = 0; i < n && !is_straight(b, e) && !ierr; i++)
            gmshModelGeoAddLine(c[i].a + 1, c[i].b + 1, tag++, &ierr);
    }
    b->first_line[b->net->n_edge] = tag;
    return ierr ? gmsh_failed(err, "take the boundary") : UTW_OK;
}

/* Gmsh's curve loop for one loop of the net: its lines in order, signed. */
static int give_loop(const boundary *b, const utw_net_loop *loop, int *tags, int *ierr)
{
    size_t n = 0;
    for (int i = 0; i < loop->n; i++) {
        const int ref = loop->ref[i], e = ref > 0 ? ref - 1 : -ref - 1;
        const int first = b->first_line[e], end = b->first_line[e + 1];
        for (int k = 0; k < end - first; k++) tags[n++] = ref > 0 ? first + k : -(end - 1 - k);
    }
    return gmshModelGeoAddCurveLoop(tags, n, -1, 0, ierr);
}

static utw_status give_parts(const boundary *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_net *net = b->net;
    int ierr = 0, *tags = NULL, *loops = NULL;
    UTW_TRY_ALLOC(tags = utw_alloc((size_t)b->first_line[net->n_edge], sizeof *tags));
    UTW_TRY_ALLOC(loops = utw_alloc((size_t)net->n_loop, sizeof *loops));
    for (int l = 0; l < net->n_loop && !ierr;) {
        const int part = net->loop[l].part;
        size_t n = 0;
        for (; l < net->n_loop && net->loop[l].part == part && !ierr; l++)
            loops[n++] = give_loop(b, &net->loop[l], tags, &ierr);
        if (!ierr) gmshModelGeoAddPlaneSurface(loops, n, part + 1, &ierr);
    }
    st = ierr ? gmsh_failed(err, "take the boundary") : UTW_OK;
done:
    utw_free(tags);
    utw_free(loops);
    return st;
}

/* The mesh of points and lines is ours already: left to itself Gmsh would integrate along every
 * line to divide it. */
static int give_point_node(const boundary *b, int point)
{
    int ierr = 0;
    size_t tag = (size_t)point + 1;
    double xyz[3] = {b->xy[point][0], b->xy[point][1], 0};
    gmshModelMeshAddNodes(0, point + 1, &tag, 1, xyz, 3, NULL, 0, &ierr);
    return ierr;
}

/* Sides from..to-1 of an edge, all on one line. */
static int give_sides_on(const boundary *b, int line, int from, int to, size_t *work)
{
    int ierr = 0;
    size_t *tag = work, *node = work + (to - from);
    for (int i = from; i < to; i++) {
        tag[i - from] = (size_t)i + 1;
        node[2 * (i - from)] = (size_t)b->chord[i].a + 1;
        node[2 * (i - from) + 1] = (size_t)b->chord[i].b + 1;
    }
    const size_t n = (size_t)(to - from);
    gmshModelMeshAddElementsByType(line, LINE_TYPE, tag, n, node, 2 * n, &ierr);
    return ierr;
}

/* The nodes inside a straight edge, at even fractions. */
static int give_line_nodes(const boundary *b, int edge, size_t *tag, double *xyz)
{
    int ierr = 0;
    const chord *c = b->chord + b->first_chord[edge];
    const size_t n = (size_t)sides_of(b, edge) - 1;
    if (n == 0) return 0;
    double *t = xyz + 3 * n;
    for (size_t i = 0; i < n; i++) {
        tag[i] = (size_t)c[i].b + 1;
        xyz[3 * i] = b->xy[c[i].b][0];
        xyz[3 * i + 1] = b->xy[c[i].b][1];
        xyz[3 * i + 2] = 0;
        t[i] = c[i].t1;
    }
    gmshModelMeshAddNodes(1, b->first_line[edge], tag, n, xyz, 3 * n, t, n, &ierr);
    return ierr;
}

static utw_status give_sides(const boundary *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int ierr = 0;
    size_t *tags = NULL;
    double *xyz = NULL;
    UTW_TRY_ALLOC(tags = utw_alloc(3 * (size_t)b->n_chord, sizeof *tags));
    UTW_TRY_ALLOC(xyz = utw_alloc(4 * (size_t)b->n_chord, sizeof *xyz));
    for (int i = 0; i < b->net->n_node && !ierr; i++) ierr = give_point_node(b, i);
    for (int e = 0; e < b->net->n_edge && !ierr; e++) {
        const int first = b->first_chord[e], n = sides_of(b, e);
        if (is_straight(b, e)) {
            ierr = give_line_nodes(b, e, tags, xyz);
            if (!ierr) ierr = give_sides_on(b, b->first_line[e], first, first + n, tags);
            continue;
        }
        for (int i = first; i + 1 < first + n && !ierr; i++)
            ierr = give_point_node(b, b->chord[i].b);
        for (int i = 0; i < n && !ierr; i++)
            ierr = give_sides_on(b, b->first_line[e] + i, first + i, first + i + 1, tags);
    }
    st = ierr ? gmsh_failed(err, "take the boundary") : UTW_OK;
done:
    utw_free(tags);
    utw_free(xyz);
    return st;
}

/* Gmsh spreads sizes into the interior as means over triangles of boundary points, which forgets
 * small features at once: it is told the size itself. */
static double size_at(int dim, int tag, double x, double y, double z, void *sizes)
{
    (void)dim, (void)tag, (void)z;
    return utw_sizes_at(sizes, (double[2]){x, y});
}

static utw_status generate(boundary *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int ierr = 0;
    utw_sizes *sizes = NULL;
    UTW_TRY(
        utw_sizes_create(b->n_point, (const double(*)[2])b->xy, b->size, b->growth, &sizes, err));
    UTW_TRY(give_lines(b, err));
    UTW_TRY(give_parts(b, err));
    gmshModelGeoSynchronize(&ierr);
    UTW_TRY(give_sides(b, err));
    if (!ierr) gmshModelMeshSetSizeCallback(size_at, sizes, &ierr);
    if (!ierr) gmshModelMeshGenerate(2, &ierr);
    st = ierr ? gmsh_failed(err, "fill the outline with triangles") : UTW_OK;
done:
    utw_sizes_free(sizes);
    return st;
}

/* ---- reading the mesh back
 * ----------------------------------------------------------------------- */

static utw_status read_nodes(utw_mesh *mesh, const boundary *b, int **node_of_tag, size_t *n_tag,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    size_t *tag = NULL, n = 0, n_xyz = 0, n_par = 0, most = 0;
    double *xyz = NULL, *par = NULL;
    int ierr = 0;
    gmshModelMeshGetNodes(&tag, &n, &xyz, &n_xyz, &par, &n_par, -1, -1, 0, 0, &ierr);
    if (ierr || n < (size_t)b->n_point) {
        st = gmsh_failed(err, "fill the outline with triangles");
        goto done;
    }
    for (size_t i = 0; i < n; i++) most = tag[i] > most ? tag[i] : most;
    UTW_TRY_ALLOC(*node_of_tag = utw_alloc(most + 1, sizeof **node_of_tag));
    UTW_TRY_ALLOC(mesh->xy = utw_alloc(n, sizeof *mesh->xy));
    *n_tag = most + 1;
    mesh->n_node = (int)n;
    /* Boundary nodes keep the tags we gave; make sure, and take our own coordinates. */
    int inner = b->n_point;
    for (size_t i = 0; i < n; i++) {
        const int own = tag[i] <= (size_t)b->n_point, node = own ? (int)tag[i] - 1 : inner++;
        const double xy[2] = {xyz[3 * i], xyz[3 * i + 1]};
        if (node >= (int)n || (own && !(utw_distance(xy, b->xy[node]) <= 1e-3 * b->size[node]))) {
            st = utw_fail(err, UTW_E_INTERNAL, "the mesher renumbered the boundary");
            goto done;
        }
        (*node_of_tag)[tag[i]] = node;
        for (int k = 0; k < 2; k++) mesh->xy[node][k] = own ? b->xy[node][k] : xy[k];
    }
    st = UTW_OK;
done:
    gmshFree(tag);
    gmshFree(xyz);
    gmshFree(par);
    return st;
}

static utw_status read_part(utw_mesh *mesh, int part, const int *node_of_tag, size_t n_tag,
                            size_t *capacity, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    size_t *tag = NULL, n = 0, *node = NULL, n_node = 0;
    int ierr = 0;
    gmshModelMeshGetElementsByType(TRIANGLE_TYPE, &tag, &n, &node, &n_node, part + 1, 0, 1, &ierr);
    void *list = mesh->tri;
    if (ierr || n == 0 || n_node != 3 * n) {
        st = gmsh_failed(err, "fill a part with triangles");
        goto done;
    }
    if (utw_grow(&list, capacity, (size_t)mesh->n_tri + n, sizeof *mesh->tri) != 0) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    mesh->tri = list;
    for (size_t i = 0; i < n; i++) {
        utw_triangle t = {.part = part, .curve = {-1, -1, -1}};
        for (int k = 0; k < 3; k++) {
            if (node[3 * i + (size_t)k] >= n_tag) goto done;
            t.node[k] = node_of_tag[node[3 * i + (size_t)k]];
        }
        if (utw_turn(mesh->xy[t.node[0]], mesh->xy[t.node[1]], mesh->xy[t.node[2]]) < 0) {
            const int swap = t.node[1];
            t.node[1] = t.node[2];
            t.node[2] = swap;
        }
        mesh->tri[mesh->n_tri++] = t;
    }
    st = UTW_OK;
done:
    gmshFree(tag);
    gmshFree(node);
    return st;
}

/* Give each chord to the side of a triangle that joins the same two points. */
static utw_status find_curves(utw_mesh *mesh, const boundary *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *first = NULL, *next = NULL;
    UTW_TRY_ALLOC(first = utw_alloc((size_t)b->n_point, sizeof *first));
    UTW_TRY_ALLOC(next = utw_alloc((size_t)b->n_chord, sizeof *next));
    for (int i = 0; i < b->n_point; i++) first[i] = -1;
    for (int i = 0; i < b->n_chord; i++) {
        const int lo = b->chord[i].a < b->chord[i].b ? b->chord[i].a : b->chord[i].b;
        next[i] = first[lo];
        first[lo] = i;
    }
    int found = 0;
    for (int e = 0; e < mesh->n_edge; e++) {
        const utw_mesh_edge *edge = &mesh->edge[e];
        if (edge->node[0] >= b->n_point || edge->node[1] >= b->n_point) continue;
        for (int i = first[edge->node[0]]; i >= 0; i = next[i]) {
            const chord *c = &b->chord[i];
            if (c->a + c->b != edge->node[0] + edge->node[1])
                continue; /* one end is the same already */
            for (int side = 0; side < 2 && edge->tri[side] >= 0; side++) {
                utw_triangle *t = &mesh->tri[edge->tri[side]];
                const int k = edge->slot[side], forward = t->node[k] == c->a;
                t->curve[k] = c->edge;
                t->t[k][0] = forward ? c->t0 : c->t1;
                t->t[k][1] = forward ? c->t1 : c->t0;
            }
            found++;
        }
    }
    if (found != b->n_chord) {
        st = gmsh_failed(err, "keep the boundary");
        goto done;
    }
    st = UTW_OK;
done:
    utw_free(first);
    utw_free(next);
    return st;
}

static utw_status read_mesh(const boundary *b, utw_mesh **mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *node_of_tag = NULL;
    size_t n_tag = 0, capacity = 0;
    utw_mesh *m;
    UTW_TRY_ALLOC(m = utw_alloc(1, sizeof *m));
    m->net = b->net;
    UTW_TRY(read_nodes(m, b, &node_of_tag, &n_tag, err));
    for (int p = 0; p < b->net->n_part; p++)
        UTW_TRY(read_part(m, p, node_of_tag, n_tag, &capacity, err));
    UTW_TRY(utw_mesh_connect(m, err));
    UTW_TRY(find_curves(m, b, err));
    *mesh = m;
    m = NULL;
    st = UTW_OK;
done:
    utw_free(node_of_tag);
    utw_mesh_free(m);
    return st;
}

/* Gmsh 4.8 loses memory with every start and stop, more each time (20 kB a round after a thousand),
 * so it is started once and left running; its state is global in any case. */
static utw_status start_gmsh(utw_error *err)
{
    static int started;
    int ierr = 0;
    if (started) return UTW_OK;
    gmshInitialize(0, NULL, 0, &ierr);
    if (ierr) return gmsh_failed(err, "start");
    started = 1;
    return UTW_OK;
}

/* Set anew each time: the program around the library may use Gmsh as well. */
static utw_status set_options(utw_error *err)
{
    static const struct {
        const char *name;
        double value;
    } option[] = {
        {"General.Terminal", 0},
        {"General.AbortOnError", 0},
        {"General.Verbosity", 0},
        {"Mesh.Algorithm", 5}, /* Delaunay: the frontal one leaves fans of needles where sizes grow
                                  fast */
        {"Mesh.MeshSizeExtendFromBoundary", 0},
        {"Mesh.MeshSizeFromPoints", 0},
        {"Mesh.MaxNumThreads2D", 1},
        {"Mesh.MeshOnlyEmpty", 1}, /* the lines are meshed already */
        {"Mesh.Smoothing", 0},
        {"Mesh.Renumber", 0}, /* boundary nodes are found again by their tags */
        {"Mesh.RandomSeed", 1},
    };
    for (size_t i = 0; i < sizeof option / sizeof *option; i++) {
        int ierr = 0;
        gmshOptionSetNumber(option[i].name, option[i].value, &ierr);
        if (ierr) return gmsh_failed(err, "take its options");
    }
    return UTW_OK;
}

utw_status utw_mesh_triangulate(const utw_net *net, const utw_division *division, double growth,
                                utw_mesh **mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int ierr = 0, added = 0;
    boundary b = {.net = net, .division = division, .growth = growth};
    UTW_TRY(boundary_fill(&b, err));
    UTW_TRY(start_gmsh(err));
    UTW_TRY(set_options(err));
    gmshModelAdd("section", &ierr);
    added = !ierr;
    UTW_TRY(generate(&b, err));
    UTW_TRY(read_mesh(&b, mesh, err));
    st = UTW_OK;
done:
    if (added) {
        gmshModelMeshRemoveSizeCallback(&ierr);
        gmshModelRemove(&ierr);
    }
    boundary_clear(&b);
    return st;
}
