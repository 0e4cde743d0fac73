/* SPDX-License-Identifier: GPL-3.0-or-later
 * A raster of the page. */
#include "draw/labels.h"

#include <math.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* A cell holds 0, the id of the one contour in it, or TAKEN. */
enum { TAKEN = 65535 };

struct utw_labels {
    int nx, ny;
    unsigned short *cell; /* [ny][nx], owned */
};

utw_status utw_labels_create(double width, double height, utw_labels **labels, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_labels *l = NULL;
    UTW_TRY_ALLOC(l = utw_alloc(1, sizeof *l));
    l->nx = (int)ceil(width / UTW_LABEL_CELL);
    l->ny = (int)ceil(height / UTW_LABEL_CELL);
    UTW_TRY_ALLOC(l->cell = utw_alloc((size_t)l->nx * (size_t)l->ny, sizeof *l->cell));
    *labels = l;
    l = NULL;
    st = UTW_OK;
done:
    utw_labels_free(l);
    return st;
}

void utw_labels_free(utw_labels *l)
{
    if (l == NULL) return;
    utw_free(l->cell);
    utw_free(l);
}

static int index_of(double mm, int n)
{
    const double i = floor(mm / UTW_LABEL_CELL);
    return i < 0 ? 0 : i > n - 1 ? n - 1 : (int)i;
}

static unsigned short *cell_at(const utw_labels *l, int x, int y)
{
    return &l->cell[(size_t)y * (size_t)l->nx + (size_t)x];
}

static void take(utw_labels *l, double x, double y, int id)
{
    if (!(x >= 0 && y >= 0 && x < l->nx * UTW_LABEL_CELL && y < l->ny * UTW_LABEL_CELL)) return;
    unsigned short *cell = cell_at(l, index_of(x, l->nx), index_of(y, l->ny));
    *cell = (unsigned short)(*cell == 0 || *cell == id ? id : TAKEN);
}

/* Steps of less than a cell. */
static void take_line(utw_labels *l, const double a[2], const double b[2], int id)
{
    const double length = utw_distance(a, b), step = 0.7 * UTW_LABEL_CELL;
    if (!(length < 1e5)) return; /* off any page */
    const int n = 1 + (int)(length / step);
    for (int i = 0; i <= n; i++) {
        const double t = (double)i / n;
        take(l, a[0] + t * (b[0] - a[0]), a[1] + t * (b[1] - a[1]), id);
    }
}

void utw_labels_take_line(utw_labels *l, const double a[2], const double b[2])
{
    take_line(l, a, b, TAKEN);
}

void utw_labels_take_contour(utw_labels *l, const utw_paths *p, int id)
{
    for (int k = 0; k < p->n_path; k++) {
        const int first = p->first[k], end = utw_paths_end(p, k);
        for (int i = first; i + 1 < end; i++) take_line(l, p->xy[i], p->xy[i + 1], id);
        if (p->closed[k]) take_line(l, p->xy[end - 1], p->xy[first], id);
    }
}

void utw_labels_take_box(utw_labels *l, utw_box b)
{
    if (b.x1 < 0 || b.y1 < 0 || b.x0 > l->nx * UTW_LABEL_CELL || b.y0 > l->ny * UTW_LABEL_CELL)
        return;
    for (int y = index_of(b.y0, l->ny); y <= index_of(b.y1, l->ny); y++)
        for (int x = index_of(b.x0, l->nx); x <= index_of(b.x1, l->nx); x++)
            *cell_at(l, x, y) = TAKEN;
}

int utw_labels_free_for(const utw_labels *l, utw_box b, double gap, int id)
{
    b = (utw_box){b.x0 - gap, b.y0 - gap, b.x1 + gap, b.y1 + gap};
    if (!(b.x0 >= 0 && b.y0 >= 0 && b.x1 <= l->nx * UTW_LABEL_CELL &&
          b.y1 <= l->ny * UTW_LABEL_CELL))
        return 0;
    for (int y = index_of(b.y0, l->ny); y <= index_of(b.y1, l->ny); y++)
        for (int x = index_of(b.x0, l->nx); x <= index_of(b.x1, l->nx); x++) {
            const int cell = *cell_at(l, x, y);
            if (cell != 0 && cell != id) return 0;
        }
    return 1;
}

int utw_labels_free_line(const utw_labels *l, const double a[2], const double b[2], double skip)
{
    const double length = utw_distance(a, b);
    const int n = 1 + (int)(length / (0.5 * UTW_LABEL_CELL));
    for (int i = 0; i <= n; i++) {
        const double t = (double)i / n, x = a[0] + t * (b[0] - a[0]), y = a[1] + t * (b[1] - a[1]);
        if (t * length < skip) continue;
        if (*cell_at(l, index_of(x, l->nx), index_of(y, l->ny)) != 0) return 0;
    }
    return 1;
}

int utw_labels_find(const utw_labels *l, double x, double y, double width, double height,
                    double near, double far, double gap, utw_box *box)
{
    /* directions in the order a draughtsman tries them: beside, then above and below */
    static const double angle[] = {-30, 30, 210, 150, -60, 60, 240, 120, 0, 180, -90, 90};
    for (double off = near; off <= far; off += 0.5 * height)
        for (size_t i = 0; i < sizeof angle / sizeof *angle; i++) {
            const double c = cos(angle[i] * (UTW_PI / 180)), s = sin(angle[i] * (UTW_PI / 180));
            /* the box touches the circle of radius `off` with its nearest point */
            const double cx = x + off * c + 0.5 * width * (fabs(c) < 0.1 ? 0 : c > 0 ? 1 : -1);
            const double cy = y + off * s + 0.5 * height * (fabs(s) < 0.1 ? 0 : s > 0 ? 1 : -1);
            const utw_box b = {cx - 0.5 * width, cy - 0.5 * height, cx + 0.5 * width,
                               cy + 0.5 * height};
            if (!utw_labels_free_for(l, b, gap, 0)) continue;
            *box = b;
            return 1;
        }
    return 0;
}
