/* SPDX-License-Identifier: GPL-3.0-or-later
 * A depth buffer. */
#include "draw/stage.h"

#include <math.h>

#include "base/memory.h"
#include "base/status.h"

enum { SAMPLES = 2 }; /* of a pixel, each way */

typedef struct sample {
    float depth;                /* toward the viewer */
    unsigned char r, g, b, any; /* any: 1 when something is there */
} sample;

struct utw_stage {
    int nx, ny;                  /* samples */
    double x0, y0, per_x, per_y; /* sample = (right - x0) * per_x, (y0 - up) * per_y */
    sample *at;                  /* [ny][nx], owned */
};

utw_view utw_view_of(double turn, double tilt)
{
    const double c = cos(turn), s = sin(turn), C = cos(tilt), S = sin(tilt);
    return (utw_view){{{c, 0, s}, {s * S, C, -c * S}, {-s * C, S, c * C}}};
}

void utw_view_point(const utw_view *v, const double xyz[3], double p[3])
{
    for (int i = 0; i < 3; i++)
        p[i] = v->m[i][0] * xyz[0] + v->m[i][1] * xyz[1] + v->m[i][2] * xyz[2];
}

utw_status utw_stage_create(int nx, int ny, const double box[4], utw_stage **stage, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_stage *s = NULL;
    UTW_TRY_ALLOC(s = utw_alloc(1, sizeof *s));
    s->nx = SAMPLES * nx;
    s->ny = SAMPLES * ny;
    s->x0 = box[0];
    s->y0 = box[3];
    s->per_x = s->nx / (box[2] - box[0]);
    s->per_y = s->ny / (box[3] - box[1]);
    UTW_TRY_ALLOC(s->at = utw_alloc((size_t)s->nx * (size_t)s->ny, sizeof *s->at));
    *stage = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_stage_free(s);
    return st;
}

void utw_stage_free(utw_stage *s)
{
    if (s == NULL) return;
    utw_free(s->at);
    utw_free(s);
}

double utw_stage_light(const double n[3])
{
    /* from above, a little from the left, behind the viewer */
    static const double sun[3] = {-0.36, 0.60, 0.714};
    const double length = sqrt(n[0] * n[0] + n[1] * n[1] + n[2] * n[2]);
    if (!(length > 0)) return 1;
    const double side = n[2] < 0 ? -1 : 1; /* the side that is seen */
    const double c = side * (n[0] * sun[0] + n[1] * sun[1] + n[2] * sun[2]) / length;
    return 0.7 + 0.3 * fmax(c, 0);
}

static unsigned char level(double x)
{
    return (unsigned char)(255 * fmin(fmax(x, 0), 1) + 0.5);
}

static void put(sample *at, double depth, utw_colour c, double light)
{
    if (at->any && at->depth >= (float)depth) return;
    at->any = 1;
    at->depth = (float)depth;
    at->r = level(c.r * light);
    at->g = level(c.g * light);
    at->b = level(c.b * light);
}

/* The samples of row y from which all three of l[k] = at[k] + slope[k] x are not negative: *x0 ..
 * *x1, within 0 .. n - 1. The slack closes what rounding opens between neighbours. */
static void span(const double at[3], const double slope[3], int n, int *x0, int *x1)
{
    const double slack = 1e-9;
    double low = 0, high = n - 1;
    for (int k = 0; k < 3; k++) {
        if (slope[k] > 0)
            low = fmax(low, -(at[k] + slack) / slope[k]);
        else if (slope[k] < 0)
            high = fmin(high, -(at[k] + slack) / slope[k]);
        else if (at[k] < -slack)
            high = -1;
    }
    *x0 = high < low ? 0 : (int)ceil(low);
    *x1 = high < low ? -1 : (int)floor(high);
}

void utw_stage_triangle(utw_stage *s, const double p[3][3], const double value[3],
                        const double light[3], utw_paint paint, const void *data)
{
    double q[3][2];
    for (int k = 0; k < 3; k++) {
        q[k][0] = (p[k][0] - s->x0) * s->per_x - 0.5;
        q[k][1] = (s->y0 - p[k][1]) * s->per_y - 0.5;
    }
    const double twice =
        (q[1][0] - q[0][0]) * (q[2][1] - q[0][1]) - (q[2][0] - q[0][0]) * (q[1][1] - q[0][1]);
    if (!(fabs(twice) > 0)) return;
    const int y0 = (int)fmax(ceil(fmin(q[0][1], fmin(q[1][1], q[2][1]))), 0),
              y1 = (int)fmin(floor(fmax(q[0][1], fmax(q[1][1], q[2][1]))), s->ny - 1);
    /* barycentric coordinates along a row */
    const double slope[3] = {(q[1][1] - q[2][1]) / twice, (q[2][1] - q[0][1]) / twice,
                             (q[0][1] - q[1][1]) / twice};
    for (int y = y0; y <= y1; y++) {
        double at[3];
        int x0, x1;
        for (int k = 0; k < 3; k++) {
            const double *a = q[(k + 1) % 3], *b = q[(k + 2) % 3];
            at[k] = (a[0] * (b[1] - y) - b[0] * (a[1] - y)) / twice;
        }
        span(at, slope, s->nx, &x0, &x1);
        for (int x = x0; x <= x1; x++) {
            const double l0 = at[0] + slope[0] * x, l1 = at[1] + slope[1] * x, l2 = 1 - l0 - l1;
            put(&s->at[(size_t)y * (size_t)s->nx + (size_t)x],
                l0 * p[0][2] + l1 * p[1][2] + l2 * p[2][2],
                paint(data, l0 * value[0] + l1 * value[1] + l2 * value[2]),
                l0 * light[0] + l1 * light[1] + l2 * light[2]);
        }
    }
}

int utw_stage_sees(const utw_stage *s, const double p[3], double slack)
{
    const int x = (int)floor((p[0] - s->x0) * s->per_x), y = (int)floor((s->y0 - p[1]) * s->per_y);
    if (x < 0 || y < 0 || x >= s->nx || y >= s->ny) return 1;
    const sample *at = &s->at[(size_t)y * (size_t)s->nx + (size_t)x];
    return !at->any || (double)at->depth <= p[2] + slack;
}

utw_status utw_stage_image(const utw_stage *s, unsigned **pixel, utw_error *err)
{
    const int nx = s->nx / SAMPLES, ny = s->ny / SAMPLES, all = SAMPLES * SAMPLES;
    unsigned *image = utw_alloc((size_t)nx * (size_t)ny, sizeof *image);
    if (image == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int y = 0; y < ny; y++)
        for (int x = 0; x < nx; x++) {
            int r = 0, g = 0, b = 0, n = 0;
            for (int k = 0; k < all; k++) {
                const sample *at = &s->at[(size_t)(SAMPLES * y + k / SAMPLES) * (size_t)s->nx +
                                          (size_t)(SAMPLES * x + k % SAMPLES)];
                if (!at->any) continue;
                n++;
                r += at->r;
                g += at->g;
                b += at->b;
            }
            image[(size_t)y * (size_t)nx + (size_t)x] =
                (unsigned)(255 * n / all) << 24 | (unsigned)(r / all) << 16 |
                (unsigned)(g / all) << 8 | (unsigned)(b / all);
        }
    *pixel = image;
    return UTW_OK;
}
