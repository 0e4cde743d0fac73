/* SPDX-License-Identifier: GPL-3.0-or-later
 * Points of an aerofoil's contour: by the NACA four-digit formulas, or from a list. */
#include "outline/aerofoil.h"

#include <ctype.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* ---- NACA four digits ---- */

enum {
    SIDE = 200
}; /* intervals a side; the spline through them is within 1e-8 of the formula (tested) */

static const double SHARP = -0.1036; /* the last coefficient that closes the edge */

/* Half the thickness at x = s^2. Report 460: y_t = t/0.20 (0.2969 sqrt x - 0.1260 x - 0.3516 x^2 +
 * 0.2843 x^3 - 0.1015 x^4). */
static double half_thickness(double t, double last, double x)
{
    if (x == 1 && last == SHARP) return 0; /* not what rounding leaves */
    return 5 * t * (0.2969 * sqrt(x) + x * (-0.1260 + x * (-0.3516 + x * (0.2843 + x * last))));
}

/* Mean line y_c and its slope. Report 460: y_c = m/p^2 (2 p x - x^2) ahead of x = p, m/(1-p)^2 ((1
 * - 2 p) + 2 p x - x^2) behind. */
static double mean_line(double m, double p, double x, double *slope)
{
    if (m == 0) {
        *slope = 0;
        return 0;
    }
    const double q = x < p ? p * p : (1 - p) * (1 - p);
    *slope = 2 * m / q * (p - x);
    return m / q * ((x < p ? 0 : 1 - 2 * p) + 2 * p * x - x * x);
}

static void ordinate(double m, double p, double t, double last, double x, double side, double xy[2])
{
    double slope;
    const double yc = mean_line(m, p, x, &slope), yt = side * half_thickness(t, last, x),
                 c = 1 / hypot(1, slope);
    xy[0] = x - yt * slope * c; /* x - y_t sin theta, y_c + y_t cos theta */
    xy[1] = yc + yt * c;
}

utw_status utw_aerofoil_naca(const char *designation, int sharp, double (**xy)[2], int *n,
                             utw_error *err)
{
    int digits = designation != NULL && strlen(designation) == 4;
    for (int i = 0; digits && i < 4; i++) digits = isdigit((unsigned char)designation[i]) != 0;
    if (!digits)
        return utw_fail(
            err, UTW_E_SYNTAX,
            "\"%.20s\" is no NACA four-digit designation; it must be four digits, such as \"2412\"",
            designation != NULL ? designation : "");
    const double m = (designation[0] - '0') / 100.0, p = (designation[1] - '0') / 10.0;
    const double t = (10 * (designation[2] - '0') + (designation[3] - '0')) / 100.0;
    if (t == 0)
        return utw_fail(err, UTW_E_SYNTAX,
                        "NACA %s has no thickness; its last two digits are per cent of the chord",
                        designation);
    if (m > 0 && p == 0)
        return utw_fail(
            err, UTW_E_SYNTAX,
            "NACA %s has camber, but its second digit, where the camber is greatest, is 0",
            designation);
    double(*made)[2] = utw_alloc(2 * SIDE + 1, sizeof *made);
    if (made == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    const double last = sharp ? SHARP : -0.1015;
    for (int i = 0; i <= 2 * SIDE; i++) {
        /* sqrt x evenly spaced at the nose, where the contour is smooth in it, and closer at the
         * tail than x = s^2 */
        const double s = sin(UTW_PI / 2 * fabs((double)i - SIDE) / SIDE),
                     x = i == 0 || i == 2 * SIDE ? 1 : s * s;
        ordinate(m, p, t, last, x, i < SIDE ? 1 : -1, made[i]);
    }
    *xy = made;
    *n = 2 * SIDE + 1;
    return UTW_OK;
}

/* ---- lists ---- */

typedef struct list {
    double (*xy)[2]; /* owned */
    int *line;       /* owned: of each point */
    size_t n, capacity, line_capacity;
} list;

/* One or two numbers of a line: 2 when it holds exactly two, else 0. */
static int two_numbers(const char *text, const char *end, double xy[2])
{
    char copy[200], *at = copy, *stop;
    const size_t n = (size_t)(end - text);
    if (n >= sizeof copy) return 0;
    memcpy(copy, text, n);
    copy[n] = '\0';
    for (char *c = copy; *c != '\0'; c++)
        if (*c == ',' || *c == ';' || *c == '\t' || *c == '\r') *c = ' ';
    for (int k = 0; k < 2; k++) {
        xy[k] = strtod(at, &stop);
        if (stop == at || (*stop != ' ' && *stop != '\0') || !isfinite(xy[k])) return 0;
        at = stop;
    }
    while (*at == ' ') at++;
    return *at == '\0' ? 2 : 0;
}

static int is_blank(const char *text, const char *end)
{
    while (text < end && isspace((unsigned char)*text)) text++;
    return text == end || *text == '#';
}

static utw_status add_point(list *l, const double xy[2], int line, utw_error *err)
{
    void *points = l->xy, *lines = l->line;
    if (utw_grow(&points, &l->capacity, l->n + 1, sizeof *l->xy) != 0 ||
        (l->xy = points, utw_grow(&lines, &l->line_capacity, l->n + 1, sizeof *l->line)) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%zu points)", l->n);
    l->line = lines;
    l->xy[l->n][0] = xy[0];
    l->xy[l->n][1] = xy[1];
    l->line[l->n++] = line;
    return UTW_OK;
}

static utw_status at_line(utw_error *err, int line, utw_status st)
{
    if (err != NULL) err->line = line;
    return st;
}

#define FAIL(err, number, ...) at_line(err, number, utw_fail(err, UTW_E_SYNTAX, __VA_ARGS__))

static utw_status read_lines(const char *text, size_t n, list *l, utw_error *err)
{
    int number = 0, named = 0;
    for (const char *at = text, *stop = text + n; at < stop;) {
        const char *end = memchr(at, '\n', (size_t)(stop - at));
        if (end == NULL) end = stop;
        double xy[2];
        number++;
        if (!is_blank(at, end)) {
            if (two_numbers(at, end, xy) == 2) {
                if (l->n >= UTW_AEROFOIL_POINTS)
                    return FAIL(err, number, "line %d: there are more than %d points", number,
                                UTW_AEROFOIL_POINTS);
                const utw_status st = add_point(l, xy, number, err);
                if (st != UTW_OK) return st;
            } else if (l->n == 0 && !named) {
                named = 1;
            } else {
                const int shown = end - at > 40 ? 40 : (int)(end - at);
                return FAIL(err, number, "line %d is not two numbers: \"%.*s\"", number, shown, at);
            }
        }
        at = end < stop ? end + 1 : stop;
    }
    return UTW_OK;
}

static void drop_point(list *l, size_t i)
{
    l->n--;
    memmove(&l->xy[i], &l->xy[i + 1], (l->n - i) * sizeof *l->xy);
    memmove(&l->line[i], &l->line[i + 1], (l->n - i) * sizeof *l->line);
}

static void reverse(list *l, size_t from, size_t to)
{
    for (; from + 1 < to; from++, to--) {
        const double x = l->xy[from][0], y = l->xy[from][1];
        const int line = l->line[from];
        memcpy(l->xy[from], l->xy[to - 1], sizeof l->xy[from]);
        l->line[from] = l->line[to - 1];
        l->xy[to - 1][0] = x;
        l->xy[to - 1][1] = y;
        l->line[to - 1] = line;
    }
}

static void range(const list *l, double *least, double *greatest)
{
    *least = HUGE_VAL;
    *greatest = -HUGE_VAL;
    for (size_t i = 0; i < l->n; i++) {
        *least = fmin(*least, l->xy[i][0]);
        *greatest = fmax(*greatest, l->xy[i][0]);
    }
}

/* Two runs from leading to trailing edge become one run from trailing edge to trailing edge. */
static void join_runs(list *l, double least, double length)
{
    if (l->xy[0][0] > least + 0.25 * length) return;
    for (size_t i = 1; i + 1 < l->n; i++)
        if (l->xy[i + 1][0] < l->xy[i][0] - 0.5 * length) {
            reverse(l, 0, i + 1);
            return;
        }
}

static void drop_repeated(list *l, double length)
{
    for (size_t i = 1; i < l->n;)
        if (fabs(l->xy[i][0] - l->xy[i - 1][0]) <= 1e-9 * length &&
            fabs(l->xy[i][1] - l->xy[i - 1][1]) <= 1e-9 * length)
            drop_point(l, i);
        else
            i++;
}

static utw_status check_run(const list *l, double least, double length, utw_error *err)
{
    const size_t last = l->n - 1;
    for (int k = 0; k < 2; k++) {
        const size_t i = k == 0 ? 0 : last;
        if (l->xy[i][0] < least + 0.9 * length)
            return FAIL(err, l->line[i],
                        "line %d: (%g, %g) is the %s point, but no trailing edge; list the points "
                        "from the trailing edge around "
                        "the nose and back to it",
                        l->line[i], l->xy[i][0], l->xy[i][1], k == 0 ? "first" : "last");
    }
    size_t nose = 0;
    for (size_t i = 0; i < l->n; i++)
        if (l->xy[i][0] < l->xy[nose][0]) nose = i;
    for (size_t i = 1; i < l->n; i++) {
        const double step = l->xy[i][0] - l->xy[i - 1][0];
        if (i <= nose ? step > 0.02 * length : step < -0.02 * length)
            return FAIL(err, l->line[i],
                        "line %d: (%g, %g) lies behind the point before it; the points must run "
                        "once around the contour",
                        l->line[i], l->xy[i][0], l->xy[i][1]);
    }
    return UTW_OK;
}

utw_status utw_aerofoil_points(const char *text, size_t n_text, double (**xy)[2], int *n,
                               utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    list l = {.n = 0};
    double least, greatest, area = 0;
    UTW_TRY(read_lines(text, n_text, &l, err));
    /* counts of two runs, such as "61. 61.", at the top */
    if (l.n > 2 && l.xy[0][0] > 2 && l.xy[0][0] + l.xy[0][1] <= (double)l.n &&
        l.xy[0][0] + l.xy[0][1] >= (double)l.n - 2 && l.xy[0][0] == floor(l.xy[0][0]) &&
        l.xy[0][1] == floor(l.xy[0][1]))
        drop_point(&l, 0);
    range(&l, &least, &greatest);
    const double length = greatest - least;
    if (l.n < 7) {
        st = utw_fail(err, UTW_E_SYNTAX,
                      "there are %zu points; at least 7 are needed to draw an aerofoil", l.n);
        goto done;
    }
    if (!(length > 0)) {
        st = utw_fail(err, UTW_E_SYNTAX, "all points have the same x; x runs along the chord");
        goto done;
    }
    join_runs(&l, least, length);
    drop_repeated(&l, length);
    UTW_TRY(check_run(&l, least, length, err));
    for (size_t i = 0; i < l.n; i++) area += utw_cross(l.xy[i], l.xy[(i + 1) % l.n]);
    if (area < 0) reverse(&l, 0, l.n);
    for (size_t i = 0; i < l.n; i++) {
        l.xy[i][0] = (l.xy[i][0] - least) / length;
        l.xy[i][1] /= length;
    }
    *xy = l.xy;
    *n = (int)l.n;
    l.xy = NULL;
    st = UTW_OK;
done:
    utw_free(l.xy);
    utw_free(l.line);
    return st;
}
