/* SPDX-License-Identifier: GPL-3.0-or-later
 * Places for arrows, on a raster of the section. */
#include "draw/arrows.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/marks.h"

/* In sizes of the font. */
#define CELL   0.25 /* of the raster */
#define APART  2.0  /* between arrows */
#define LENGTH 1.7  /* of the longest */
#define HEAD   0.55
#define SHORT  0.12 /* shorter ones are not drawn */
#define FREE   0.5  /* from the boundary, but in the thinnest walls */
#define CLOSE  0.85 /* of the distance, in thin walls */

/* A cell of the raster inside the section. */
typedef struct cell {
    double v[2];
    utw_colour colour;
    float depth; /* distance from the boundary, in cells; 0 outside */
} cell;

typedef struct field {
    int nx, ny;
    double x0, y0, size;
    cell *cell; /* [ny][nx], owned */
} field;

typedef struct place {
    int x, y;
    double key; /* the deepest come first, lattice points before all */
} place;

/* Fill the cells whose centres a triangle holds. */
static void lay_triangle(field *f, const utw_sampling *s, int t, const double (*v)[2],
                         const utw_colour *colour)
{
    const double *p[3];
    double low[2] = {UTW_INFINITY, UTW_INFINITY}, high[2] = {-UTW_INFINITY, -UTW_INFINITY};
    for (int k = 0; k < 3; k++) {
        p[k] = s->xy[s->tri[t][k]];
        for (int d = 0; d < 2; d++) {
            low[d] = fmin(low[d], p[k][d]);
            high[d] = fmax(high[d], p[k][d]);
        }
    }
    const double u[2] = {p[1][0] - p[0][0], p[1][1] - p[0][1]},
                 w[2] = {p[2][0] - p[0][0], p[2][1] - p[0][1]}, twice = utw_cross(u, w);
    if (!(fabs(twice) > 0)) return;
    const int x0 = (int)fmax(ceil((low[0] - f->x0) / f->size - 0.5), 0),
              x1 = (int)fmin(floor((high[0] - f->x0) / f->size - 0.5), f->nx - 1),
              y0 = (int)fmax(ceil((low[1] - f->y0) / f->size - 0.5), 0),
              y1 = (int)fmin(floor((high[1] - f->y0) / f->size - 0.5), f->ny - 1);
    for (int y = y0; y <= y1; y++)
        for (int x = x0; x <= x1; x++) {
            const double q[2] = {f->x0 + (x + 0.5) * f->size - p[0][0],
                                 f->y0 + (y + 0.5) * f->size - p[0][1]};
            const double b = utw_cross(q, w) / twice, c = utw_cross(u, q) / twice;
            if (b < 0 || c < 0 || b + c > 1) continue;
            cell *at = &f->cell[(size_t)y * (size_t)f->nx + (size_t)x];
            const int i = s->tri[t][0], j = s->tri[t][1], k = s->tri[t][2];
            for (int d = 0; d < 2; d++)
                at->v[d] = (1 - b - c) * v[i][d] + b * v[j][d] + c * v[k][d];
            at->colour = colour[b > c ? (b > 0.5 ? j : i) : (c > 0.5 ? k : i)];
            at->depth = 1;
        }
}

static float depth_at(const field *f, int x, int y)
{
    if (x < 0 || y < 0 || x >= f->nx || y >= f->ny) return 0;
    return f->cell[(size_t)y * (size_t)f->nx + (size_t)x].depth;
}

/* Distances in steps of 1 and of the square root of 2, by one pass each way (Rosenfeld and Pfaltz,
 * Pattern Recognition 1 (1968) 33-61). */
static void measure_depth(field *f)
{
    const float side = 1.0F, aslant = 1.4142F;
    for (int pass = 0; pass < 2; pass++)
        for (int j = 0; j < f->ny; j++)
            for (int i = 0; i < f->nx; i++) {
                const int x = pass == 0 ? i : f->nx - 1 - i, y = pass == 0 ? j : f->ny - 1 - j,
                          b = pass == 0 ? -1 : 1;
                cell *at = &f->cell[(size_t)y * (size_t)f->nx + (size_t)x];
                if (at->depth <= 0) continue;
                const float least = fminf(
                    fminf(depth_at(f, x + b, y) + side, depth_at(f, x, y + b) + side),
                    fminf(depth_at(f, x + b, y + b) + aslant, depth_at(f, x - b, y + b) + aslant));
                at->depth = pass == 0 ? least : fminf(at->depth, least);
            }
}

/* 1 when no neighbour lies deeper: the middle of a wall. */
static int is_crest(const field *f, int x, int y)
{
    for (int j = -1; j <= 1; j++)
        for (int i = -1; i <= 1; i++)
            if (depth_at(f, x + i, y + j) > depth_at(f, x, y)) return 0;
    return 1;
}

static int by_key(const void *a, const void *b)
{
    const place *p = a, *q = b;
    if (p->key != q->key) return p->key > q->key ? -1 : 1;
    return p->y != q->y ? p->y - q->y : p->x - q->x;
}

/* Inside cells in the order in which they are tried. *n of them. */
static utw_status list_places(const field *f, double apart, place **list, int *n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int all = f->nx * f->ny, pitch = (int)lround(apart), row = (int)lround(0.866 * apart);
    place *p = NULL;
    UTW_TRY_ALLOC(p = utw_alloc((size_t)all + 1, sizeof *p));
    *n = 0;
    for (int y = 0; y < f->ny; y++)
        for (int x = 0; x < f->nx; x++) {
            const double depth = (double)depth_at(f, x, y);
            if (depth <= 0 || (depth < FREE / CELL && !is_crest(f, x, y))) continue;
            const int line = y / row, shift = line % 2 == 0 ? 0 : pitch / 2;
            const int on_lattice = y % row == row / 2 && (x + shift) % pitch == pitch / 2;
            p[(*n)++] = (place){x, y, on_lattice && depth > 0.5 * apart + 1 ? 1e6 : depth};
        }
    qsort(p, (size_t)*n, sizeof *p, by_key);
    *list = p;
    p = NULL;
    st = UTW_OK;
done:
    utw_free(p);
    return st;
}

/* 1 when no arrow stands nearer than `apart`; taken[] notes the arrows. */
static int is_clear(const field *f, const unsigned char *taken, int x, int y, double apart)
{
    const int r = (int)ceil(apart);
    for (int j = y - r; j <= y + r; j++)
        for (int i = x - r; i <= x + r; i++) {
            if (i < 0 || j < 0 || i >= f->nx || j >= f->ny) continue;
            if (taken[(size_t)j * (size_t)f->nx + (size_t)i] && hypot(i - x, j - y) < apart)
                return 0;
        }
    return 1;
}

/* Keep the places that are far enough from those before. Returns how many. */
static int choose(const field *f, double apart, place *list, int n, unsigned char *taken)
{
    int m = 0;
    for (int i = 0; i < n; i++) {
        const place p = list[i];
        /* off the lattice only in walls that are too thin for it */
        if (p.key < 1e6 && p.key > 0.8 * apart) continue;
        if (!is_clear(f, taken, p.x, p.y, p.key < 1e6 ? CLOSE * apart : 0.5)) continue;
        taken[(size_t)p.y * (size_t)f->nx + (size_t)p.x] = 1;
        list[m++] = p;
    }
    return m;
}

static int meets(const double a[2], const double b[2], int n, const utw_box *box, double gap)
{
    for (int i = 0; i < n; i++)
        if (fmax(a[0], b[0]) > box[i].x0 - gap && fmin(a[0], b[0]) < box[i].x1 + gap &&
            fmax(a[1], b[1]) > box[i].y0 - gap && fmin(a[1], b[1]) < box[i].y1 + gap)
            return 1;
    return 0;
}

static void draw(const utw_page *page, const field *f, const place *list, int n, int n_box,
                 const utw_box *box, double *most)
{
    const double font = page->font;
    *most = 0;
    for (int i = 0; i < n; i++)
        *most =
            fmax(*most, utw_norm(f->cell[(size_t)list[i].y * (size_t)f->nx + (size_t)list[i].x].v));
    for (int i = 0; i<n && * most> 0; i++) {
        const cell *c = &f->cell[(size_t)list[i].y * (size_t)f->nx + (size_t)list[i].x];
        const double length = LENGTH * font * utw_norm(c->v) / *most, half = 0.5 * length;
        if (length < SHORT * font) continue;
        const double d[2] = {c->v[0] / utw_norm(c->v), -c->v[1] / utw_norm(c->v)};
        const double at[2] = {f->x0 + (list[i].x + 0.5) * f->size,
                              f->y0 + (list[i].y + 0.5) * f->size};
        const double a[2] = {at[0] - half * d[0], at[1] - half * d[1]},
                     b[2] = {at[0] + half * d[0], at[1] + half * d[1]};
        const utw_pen pen = {.width = 1.6 * utw_hairline(page), .colour = c->colour};
        if (!meets(a, b, n_box, box, 0.15 * font))
            utw_mark_arrow(page->canvas, a, b, fmin(HEAD * font, 0.6 * length), &pen);
    }
}

utw_status utw_arrows_draw(const utw_page *page, const utw_sampling *s, const double (*vector)[2],
                           const utw_colour *colour, int n_box, const utw_box *box, double *most,
                           utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double size = CELL * page->font, apart = APART / CELL;
    field f = {0, 0, page->room.x0, page->room.y0, size, NULL};
    place *list = NULL;
    unsigned char *taken = NULL;
    int n;
    f.nx = 1 + (int)((page->room.x1 - page->room.x0) / size);
    f.ny = 1 + (int)((page->room.y1 - page->room.y0) / size);
    UTW_TRY_ALLOC(f.cell = utw_alloc((size_t)f.nx * (size_t)f.ny, sizeof *f.cell));
    UTW_TRY_ALLOC(taken = utw_alloc((size_t)f.nx * (size_t)f.ny, sizeof *taken));
    for (int t = 0; t < s->n_tri; t++) lay_triangle(&f, s, t, vector, colour);
    measure_depth(&f);
    UTW_TRY(list_places(&f, apart, &list, &n, err));
    n = choose(&f, apart, list, n, taken);
    draw(page, &f, list, n, n_box, box, most);
    st = UTW_OK;
done:
    utw_free(f.cell);
    utw_free(taken);
    utw_free(list);
    return st;
}
