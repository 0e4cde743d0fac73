/* SPDX-License-Identifier: GPL-3.0-or-later
 * The solution as a VTK XML unstructured grid: elements of high order, appended binary data ("VTK
 * File Formats", the XML formats; the cells are those of Moxey, Sastry and Kirby, Computing in
 * Science and Engineering 22 (2020), number 69: triangles with equidistant nodes). */
#include <math.h>
#include <stdint.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/text.h"
#include "draw/bytes.h"
#include "report/report.h"
#include "section/cases.h"
#include "section/stress_case.h"

enum { LAGRANGE_TRIANGLE = 69 };

/* Curved elements get at least this order: their sides are arcs and splines. */
enum { ORDER_CURVED = 4 };

/* An array of the file: one number or three at each point. */
typedef struct column {
    char *name; /* escaped, owned */
    int width;
    double *value; /* [n_point][width], owned */
} column;

typedef struct grid {
    const utw_solution *solution;
    int n_cell, n_point, n_column, n_case;
    int *order, *first;    /* [n_cell] order, first point; owned */
    double *xyz;           /* [n_point][3], owned */
    column *column;        /* [n_column], owned */
    utw_stress_case *load; /* [n_case], owned */
} grid;

/* The columns before those of the load cases, of which each has three. */
enum { OMEGA, PHI, TAU_VX, TAU_VY, TAU_T, N_FIXED, N_OF_CASE = 3 };

static void clear_grid(grid *g)
{
    for (int k = 0; g->column != NULL && k < g->n_column; k++) {
        utw_free(g->column[k].name);
        utw_free(g->column[k].value);
    }
    utw_free(g->column);
    utw_free(g->order);
    utw_free(g->first);
    utw_free(g->xyz);
    utw_free(g->load);
}

static int n_node(int order)
{
    return (order + 1) * (order + 2) / 2;
}

/* Node k of a triangle: corners, then the sides, then a triangle inside. */
static void node_of(int order, int k, int *i, int *j)
{
    int in = 0;
    while (order >= 3 && k >= 3 * order) {
        k -= 3 * order;
        order -= 3;
        in++;
    }
    const int side = order > 1 && k >= 3 ? (k - 3) / (order - 1) : -1;
    const int step = side >= 0 ? 1 + (k - 3) % (order - 1) : 0;
    *i = side == 0 ? step : side == 1 ? order - step : side == 2 ? 0 : k == 1 ? order : 0;
    *j = side == 0 ? 0 : side == 1 ? step : side == 2 ? order - step : k == 2 ? order : 0;
    *i += in;
    *j += in;
}

/* ---- points and values -------------------------------------------------------------------------
 */

static utw_status count_points(grid *g, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_field *f = g->solution->solved.field;
    const utw_mesh *mesh = g->solution->solved.mesh;
    g->n_cell = mesh->n_tri;
    UTW_TRY_ALLOC(g->order = utw_alloc((size_t)g->n_cell, sizeof *g->order));
    UTW_TRY_ALLOC(g->first = utw_alloc((size_t)g->n_cell, sizeof *g->first));
    for (int t = 0; t < g->n_cell; t++) {
        utw_element e;
        int curved = 0;
        utw_field_element(f, t, &e);
        for (int k = 0; k < 3; k++) curved |= utw_mesh_is_curved(mesh, &mesh->tri[t], k);
        g->order[t] = curved && e.top < ORDER_CURVED ? ORDER_CURVED : e.top;
        g->first[t] = g->n_point;
        g->n_point += n_node(g->order[t]);
    }
    st = UTW_OK;
done:
    return st;
}

/* The name of an array, safe in an attribute (Extensible Markup Language 1.0, 2.4). */
static utw_status name_column(column *c, const char *before, const char *name, utw_error *err)
{
    utw_text text = {0};
    for (const char *s = before; *s != '\0'; s++) switch (*s) {
        case '&':
            utw_text_add(&text, "&amp;");
            break;
        case '<':
            utw_text_add(&text, "&lt;");
            break;
        case '>':
            utw_text_add(&text, "&gt;");
            break;
        case '"':
            utw_text_add(&text, "&quot;");
            break;
        default:
            utw_text_add(&text, "%c", (unsigned char)*s < 32 ? ' ' : *s);
        }
    utw_text_add(&text, "%s%s", before[0] == '\0' ? "" : ": ", name);
    return utw_text_take(&text, &c->name, err);
}

/* The load cases that have results. */
static utw_status list_cases(grid *g, const utw_cases *cases, const utw_unit_stress *unit,
                             const char **name, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    for (int k = 0; k < (cases == NULL ? 0 : utw_cases_count(cases)); k++) {
        utw_forces forces;
        utw_error why;
        const char *of;
        if (utw_cases_get(cases, k, &of, &forces, NULL, &why) != UTW_OK) continue;
        UTW_TRY(utw_stress_case_of(unit, &forces, &g->load[g->n_case], err));
        name[g->n_case++] = of;
    }
    st = UTW_OK;
done:
    return st;
}

static utw_status add_columns(grid *g, const utw_cases *cases, const utw_unit_stress *unit,
                              utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    static const char *const fixed[N_FIXED] = {"omega", "phi", "tau of Vx = 1", "tau of Vy = 1",
                                               "tau of T = 1"};
    static const char *const of_case[N_OF_CASE] = {"sigma_z", "tau", "von_mises"};
    const size_t most = cases == NULL ? 1 : 1 + (size_t)utw_cases_count(cases);
    const char **name = NULL;
    UTW_TRY_ALLOC(name = utw_alloc(most, sizeof *name));
    UTW_TRY_ALLOC(g->load = utw_alloc(most, sizeof *g->load));
    UTW_TRY(list_cases(g, cases, unit, name, err));
    const int n = N_FIXED + N_OF_CASE * g->n_case;
    UTW_TRY_ALLOC(g->column = utw_alloc((size_t)n, sizeof *g->column));
    UTW_TRY_ALLOC(g->xyz = utw_alloc(3 * (size_t)g->n_point, sizeof *g->xyz));
    g->n_column = n;
    for (int k = 0; k < n; k++) {
        column *c = &g->column[k];
        const int of = (k - N_FIXED) % N_OF_CASE;
        c->width = k < N_FIXED ? (k < TAU_VX ? 1 : 3) : of == 1 ? 3 : 1;
        UTW_TRY(name_column(c, k < N_FIXED ? "" : name[(k - N_FIXED) / N_OF_CASE],
                            k < N_FIXED ? fixed[k] : of_case[of], err));
        UTW_TRY_ALLOC(c->value =
                          utw_alloc((size_t)c->width * (size_t)g->n_point, sizeof *c->value));
    }
    st = UTW_OK;
done:
    utw_free(name);
    return st;
}

static void set_case(grid *g, int k, int at, const utw_unit_point *p)
{
    const utw_stress_case *c = &g->load[k];
    column *to = &g->column[N_FIXED + N_OF_CASE * k];
    const double sigma = c->one + c->x * p->xy[0] + c->y * p->xy[1] + c->omega * p->omega;
    double square = sigma * sigma;
    to[0].value[at] = sigma;
    for (int d = 0; d < 2; d++) {
        double tau = 0;
        for (int f = 0; f < UTW_N_UNIT; f++)
            tau += c->t[f] * 0.5 * (p->tau[UTW_BY_POTENTIAL][f][d] + p->tau[UTW_BY_FLUX][f][d]);
        to[1].value[3 * at + d] = tau;
        square += 3 * tau * tau;
    }
    to[2].value[at] = sqrt(square);
}

/* All values at one point, in the drawing's units. */
static void set_point(grid *g, int at, const utw_unit_element *e, double r, double s)
{
    const utw_solution *sol = g->solution;
    const double L = sol->unit, per_force = 1 / (L * L),
                 scale[UTW_N_UNIT] = {per_force, per_force, per_force / L};
    double N[UTW_FUNCTIONS_MAX], Nr[UTW_FUNCTIONS_MAX], Ns[UTW_FUNCTIONS_MAX], phi = 0;
    utw_unit_point p;
    utw_basis(e->element.top, r, s, N, Nr, Ns);
    utw_unit_point_of(e, r, s, N, Nr, Ns, &p);
    for (int i = 0; i < e->n; i++) phi += e->curl[UTW_UNIT_T][i] * N[i];
    for (int d = 0; d < 2; d++) g->xyz[3 * at + d] = sol->origin[d] + L * p.xy[d];
    g->column[OMEGA].value[at] = p.omega * L * L;
    g->column[PHI].value[at] = phi * e->unit->J * L * L; /* the unit field is that of T = 1 */
    for (int f = 0; f < UTW_N_UNIT; f++)
        for (int d = 0; d < 2; d++)
            g->column[TAU_VX + f].value[3 * at + d] =
                scale[f] * 0.5 * (p.tau[UTW_BY_POTENTIAL][f][d] + p.tau[UTW_BY_FLUX][f][d]);
    for (int k = 0; k < g->n_case; k++) set_case(g, k, at, &p);
}

static utw_status fill(grid *g, const utw_unit_stress *unit, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_unit_element *e = NULL;
    UTW_TRY_ALLOC(e = utw_alloc(1, sizeof *e));
    for (int t = 0; t < g->n_cell; t++) {
        const int p = g->order[t];
        utw_unit_element_of(unit, t, e);
        for (int k = 0; k < n_node(p); k++) {
            int i, j;
            node_of(p, k, &i, &j);
            set_point(g, g->first[t] + k, e, (double)i / p, (double)j / p);
        }
    }
    st = UTW_OK;
done:
    utw_free(e);
    return st;
}

/* ---- the file ----------------------------------------------------------------------------------
 */

/* The head: where each array begins behind the underscore. */
static void add_array(utw_text *t, const char *type, const char *name, int width, size_t bytes,
                      size_t *offset)
{
    utw_text_add(t,
                 "        <DataArray type=\"%s\" Name=\"%s\" NumberOfComponents=\"%d\" "
                 "format=\"appended\" offset=\"%zu\"/>\n",
                 type, name, width, *offset);
    *offset += sizeof(uint64_t) + bytes;
}

static void write_head(const grid *g, utw_text *t)
{
    const size_t np = (size_t)g->n_point, nc = (size_t)g->n_cell;
    const uint16_t one = 1;
    const int little = *(const unsigned char *)&one == 1;
    size_t offset = 0;
    utw_text_add(t,
                 "<?xml version=\"1.0\"?>\n<VTKFile type=\"UnstructuredGrid\" version=\"1.0\" "
                 "byte_order=\"%s\" header_type=\"UInt64\">\n  <UnstructuredGrid>\n"
                 "    <Piece NumberOfPoints=\"%d\" NumberOfCells=\"%d\">\n      <PointData>\n",
                 little ? "LittleEndian" : "BigEndian", g->n_point, g->n_cell);
    for (int k = 0; k < g->n_column; k++)
        add_array(t, "Float64", g->column[k].name, g->column[k].width,
                  np * (size_t)g->column[k].width * sizeof(double), &offset);
    utw_text_add(t, "      </PointData>\n      <CellData>\n");
    add_array(t, "Int32", "order", 1, nc * sizeof(int32_t), &offset);
    add_array(t, "Int32", "part", 1, nc * sizeof(int32_t), &offset);
    utw_text_add(t, "      </CellData>\n      <Points>\n");
    add_array(t, "Float64", "Points", 3, 3 * np * sizeof(double), &offset);
    utw_text_add(t, "      </Points>\n      <Cells>\n");
    add_array(t, "Int64", "connectivity", 1, np * sizeof(int64_t), &offset);
    add_array(t, "Int64", "offsets", 1, nc * sizeof(int64_t), &offset);
    add_array(t, "UInt8", "types", 1, nc, &offset);
    utw_text_add(t, "      </Cells>\n    </Piece>\n  </UnstructuredGrid>\n"
                    "  <AppendedData encoding=\"raw\">\n_");
}

static int add_block(utw_bytes *b, const void *data, size_t n)
{
    const uint64_t size = n;
    return utw_bytes_add(b, &size, sizeof size) == 0 && utw_bytes_add(b, data, n) == 0;
}

/* A number of every cell: its order, its part, the end of its points. */
static int add_cells(const grid *g, utw_bytes *b, int part)
{
    const uint64_t size = (uint64_t)g->n_cell * sizeof(int32_t);
    int good = utw_bytes_add(b, &size, sizeof size) == 0;
    for (int t = 0; t < g->n_cell && good; t++) {
        const int32_t v = part ? g->solution->solved.mesh->tri[t].part + 1 : g->order[t];
        good = utw_bytes_add(b, &v, sizeof v) == 0;
    }
    return good;
}

static int add_topology(const grid *g, utw_bytes *b)
{
    const uint64_t of_points = (uint64_t)g->n_point * sizeof(int64_t),
                   of_cells = (uint64_t)g->n_cell * sizeof(int64_t), of_types = (uint64_t)g->n_cell;
    int good = utw_bytes_add(b, &of_points, sizeof of_points) == 0;
    for (int64_t i = 0; i < g->n_point && good; i++) good = utw_bytes_add(b, &i, sizeof i) == 0;
    good = good && utw_bytes_add(b, &of_cells, sizeof of_cells) == 0;
    for (int t = 0; t < g->n_cell && good; t++) {
        const int64_t end = g->first[t] + n_node(g->order[t]);
        good = utw_bytes_add(b, &end, sizeof end) == 0;
    }
    good = good && utw_bytes_add(b, &of_types, sizeof of_types) == 0;
    for (int t = 0; t < g->n_cell && good; t++) {
        const unsigned char type = LAGRANGE_TRIANGLE;
        good = utw_bytes_add(b, &type, 1) == 0;
    }
    return good;
}

static utw_status write_grid(const grid *g, utw_bytes *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    static const char tail[] = "\n  </AppendedData>\n</VTKFile>\n";
    const size_t np = (size_t)g->n_point;
    utw_text text = {0};
    char *head = NULL;
    write_head(g, &text);
    UTW_TRY(utw_text_take(&text, &head, err));
    int good = utw_bytes_add(b, head, strlen(head)) == 0;
    for (int k = 0; k < g->n_column && good; k++)
        good = add_block(b, g->column[k].value, np * (size_t)g->column[k].width * sizeof(double));
    good = good && add_cells(g, b, 0) && add_cells(g, b, 1) &&
           add_block(b, g->xyz, 3 * np * sizeof(double)) && add_topology(g, b) &&
           utw_bytes_add(b, tail, sizeof tail - 1) == 0;
    st = good ? UTW_OK : utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
done:
    utw_free(head);
    return st;
}

utw_status utw_report_vtu(const utw_report *report, const char *path, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    grid g;
    utw_unit_stress unit;
    utw_bytes bytes = {NULL, 0, 0};
    memset(&g, 0, sizeof g);
    char *none = NULL;
    if (path == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_report_vtu: the path must not be NULL");
    UTW_TRY(utw_report_check(report, &none, "utw_report_vtu", err));
    g.solution = report->solution;
    utw_unit_stress_of(g.solution, &unit);
    UTW_TRY(count_points(&g, err));
    UTW_TRY(add_columns(&g, report->cases, &unit, err));
    UTW_TRY(fill(&g, &unit, err));
    UTW_TRY(write_grid(&g, &bytes, err));
    UTW_TRY(utw_bytes_save(bytes.data, bytes.n, path, err));
    st = UTW_OK;
done:
    utw_free(bytes.data);
    clear_grid(&g);
    return st;
}
