/* SPDX-License-Identifier: GPL-3.0-or-later
 * A section moved, turned, mirrored, scaled: its constants go with it, and the bounds hold wherever
 * it lies. The mesh is another one each time, so this compares solutions that share nothing but the
 * section. */
#include "support/mapping.h"
#include "support/samples.h"

/* ---- how constants go with a mapping
 * ------------------------------------------------------------- */

static double determinant(const mapping *map)
{
    return map->m[0] * map->m[3] - map->m[1] * map->m[2];
}

static double scale_of(const mapping *map)
{
    return sqrt(fabs(determinant(map)));
}

static double value(const utw_solution *s, utw_constant which)
{
    return section_constant(s, which).value;
}

/* Half the distance of the bounds. */
static double half(const utw_solution *s, utw_constant which)
{
    const utw_quantity q = section_constant(s, which);
    assert_true(q.low <= q.value && q.value <= q.high);
    return (q.high - q.low) / 2;
}

/* Exact ones agree to 1e-11 of the section's size; the others as far as their bounds reach.
 * Estimates need not overlap: 1e-5. */
static void same(const utw_solution *a, const utw_solution *b, utw_constant which, double factor,
                 double size)
{
    const utw_quantity q = section_constant(b, which);
    const double expected = factor * value(a, which);
    const double reach = fabs(factor) * half(a, which) + half(b, which);
    const double allowed = q.trust == UTW_EXACT     ? 1e-11 * size
                           : q.trust == UTW_BRACKET ? reach + 1e-12 * size
                                                    : fmax(reach, 1e-5 * size);
    if (fabs(q.value - expected) <= allowed) return;
    print_error("%s: %.17g, was %.17g: differs by %.3g, allowed %.3g\n", utw_constant_key(which),
                q.value, expected, fabs(q.value - expected), allowed);
    fail();
}

/* A point (kx, ky are its constants), or with `vector` a vector without place. */
static void same_point(const utw_solution *a, const utw_solution *b, const mapping *map,
                       utw_constant kx, utw_constant ky, double length, int vector)
{
    const double x = value(a, kx), y = value(a, ky), *m = map->m;
    const double hx = half(a, kx), hy = half(a, ky);
    const double expected[2] = {m[0] * x + m[1] * y + (vector ? 0 : map->shift[0]),
                                m[2] * x + m[3] * y + (vector ? 0 : map->shift[1])};
    const double reach[2] = {fabs(m[0]) * hx + fabs(m[1]) * hy + half(b, kx),
                             fabs(m[2]) * hx + fabs(m[3]) * hy + half(b, ky)};
    /* digits that a far origin takes */
    const double size = fmax(length, fmax(fabs(map->shift[0]), fabs(map->shift[1])));
    const utw_constant which[2] = {kx, ky};
    for (int i = 0; i < 2; i++) {
        const double off = fabs(value(b, which[i]) - expected[i]);
        if (off <= reach[i] + 1e-12 * size) continue;
        print_error("%s: %.17g, was %.17g: differs by %.3g, allowed %.3g\n",
                    utw_constant_key(which[i]), value(b, which[i]), expected[i], off, reach[i]);
        fail();
    }
}

static void same_second_moments(const utw_solution *a, const utw_solution *b, const mapping *map)
{
    /* M = int (x, y)(x, y)^T dA becomes |det m| m M m^T */
    const double xx = value(a, UTW_IYY), xy = value(a, UTW_IXY), yy = value(a, UTW_IXX),
                 *m = map->m, d = fabs(determinant(map));
    const double size = d * d * (xx + yy);
    assert_close_scaled(value(b, UTW_IYY),
                        d * (m[0] * m[0] * xx + 2 * m[0] * m[1] * xy + m[1] * m[1] * yy), 1e-11,
                        size);
    assert_close_scaled(value(b, UTW_IXX),
                        d * (m[2] * m[2] * xx + 2 * m[2] * m[3] * xy + m[3] * m[3] * yy), 1e-11,
                        size);
    assert_close_scaled(
        value(b, UTW_IXY),
        d * (m[0] * m[2] * xx + (m[0] * m[3] + m[1] * m[2]) * xy + m[1] * m[3] * yy), 1e-11, size);
}

/* The sum of both shear flexibilities does not depend on the axes. */
static void same_shear_flexibility(const utw_solution *a, const utw_solution *b, double scale)
{
    double sum[2] = {0, 0}, reach = 0;
    for (int k = 0; k < 2; k++)
        for (int i = 0; i < 2; i++) {
            const utw_constant which = i == 0 ? UTW_ASX : UTW_ASY;
            const double f = k == 0 ? 1 / (scale * scale) : 1, As = value(k == 0 ? a : b, which);
            sum[k] += f / As;
            reach += f / As * half(k == 0 ? a : b, which) / As;
        }
    if (fabs(sum[1] - sum[0]) > 1.01 * reach + 1e-12 * sum[0]) {
        print_error("1/Asx + 1/Asy = %.17g, was %.17g, allowed %.3g\n", sum[1], sum[0], reach);
        fail();
    }
}

static void compare(const utw_solution *a, const utw_solution *b, const mapping *map,
                    double degrees)
{
    const double s = scale_of(map), length = s * value(a, UTW_R0);
    static const utw_constant scalars[] = {UTW_A, UTW_PERIMETER, UTW_I1, UTW_I2,
                                           UTW_J, UTW_IW,        UTW_R0};
    for (size_t i = 0; i < sizeof scalars / sizeof *scalars; i++) {
        const double factor = pow(s, utw_constant_power(scalars[i]));
        same(a, b, scalars[i], factor, factor * fabs(value(a, scalars[i])));
    }
    same_point(a, b, map, UTW_XC, UTW_YC, length, 0);
    same_point(a, b, map, UTW_XS, UTW_YS, length, 0);
    same_point(a, b, map, UTW_XF, UTW_YF, length, 0);
    same_point(a, b, map, UTW_BETAY, UTW_BETAX, length, 1);
    same_second_moments(a, b, map);
    same_shear_flexibility(a, b, s);
    const int quarter = degrees == 0 ? 0 : degrees == 90 || degrees == -90 ? 1 : -1;
    if (quarter < 0) return;
    static const utw_constant pair[][2] = {
        {UTW_KX, UTW_KY}, {UTW_ASX, UTW_ASY}, {UTW_ZX, UTW_ZY}, {UTW_RX, UTW_RY}};
    for (size_t i = 0; i < sizeof pair / sizeof *pair; i++)
        for (int k = 0; k < 2; k++) {
            const utw_constant was = pair[i][k], is = pair[i][quarter ? 1 - k : k];
            const double factor = pow(s, utw_constant_power(was)), size = factor * value(a, was);
            const double allowed = section_constant(b, is).trust == UTW_EXACT
                                       ? 1e-11 * size
                                       : factor * half(a, was) + half(b, is) + 1e-12 * size;
            assert_true(fabs(value(b, is) - factor * value(a, was)) <= allowed);
        }
}

static void check_mapping(int sample, double tolerance, double degrees, double scale, int mirror,
                          double x, double y)
{
    const char *name;
    const mapping map = mapping_of(degrees, scale, mirror, x, y);
    utw_outline *o = sample_outline(sample, &name), *p = sample_outline(sample, &name);
    mapping_apply(&map, p);
    utw_solution *a = section_solve(o, tolerance, 0), *b = section_solve(p, tolerance, 0);
    compare(a, b, &map, degrees);
    utw_solution_free(a);
    utw_solution_free(b);
    utw_outline_free(o);
    utw_outline_free(p);
}

#define FOR_ALL_SAMPLES(...)                                                                       \
    do {                                                                                           \
        const char *name;                                                                          \
        utw_outline *o;                                                                            \
        (void)state;                                                                               \
        for (int i = 0; (o = sample_outline(i, &name)) != NULL; i++) {                             \
            utw_outline_free(o);                                                                   \
            print_message("%s\n", name);                                                           \
            __VA_ARGS__;                                                                           \
        }                                                                                          \
    } while (0)

static void moved(void **state)
{
    FOR_ALL_SAMPLES(check_mapping(i, 1e-6, 0, 1, 0, 613.7, -2090.3));
}

static void turned(void **state)
{
    FOR_ALL_SAMPLES(check_mapping(i, 1e-6, 90, 1, 0, 0, 0);
                    check_mapping(i, 1e-6, 27.3, 1, 0, 11, -7);
                    check_mapping(i, 1e-3, -161, 1, 0, 0, 0));
}

static void mirrored(void **state)
{
    FOR_ALL_SAMPLES(check_mapping(i, 1e-6, 0, 1, 1, 0, 0);
                    check_mapping(i, 1e-4, 48.1, 1, 1, 3, 5));
}

static void scaled(void **state)
{
    FOR_ALL_SAMPLES(check_mapping(i, 1e-6, 0, 1e-3, 0, 0, 0);
                    check_mapping(i, 1e-6, 0, 1e3, 0, 0, 0);
                    check_mapping(i, 1e-4, 71, 25.4, 1, -40, 12));
}

/* A power of two as the scale changes no digit: everything comes out the same bit by bit. */
static void scaled_by_a_power_of_two(void **state)
{
    (void)state;
    for (int i = 0; i < 10; i += 3) {
        const char *name;
        const mapping map = mapping_of(0, 1024, 0, 0, 0);
        utw_outline *o = sample_outline(i, &name), *p = sample_outline(i, &name);
        mapping_apply(&map, p);
        utw_solution *a = section_solve(o, 1e-5, 0), *b = section_solve(p, 1e-5, 0);
        for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
            utw_error err;
            utw_quantity q, r;
            const utw_status st = utw_solution_constant(a, (utw_constant)k, &q, &err);
            assert_int_equal(utw_solution_constant(b, (utw_constant)k, &r, &err), st);
            if (st != UTW_OK || k == UTW_ANGLE) continue;
            const double factor = exp2(10 * utw_constant_power((utw_constant)k));
            if (!(r.value == factor * q.value && r.low == factor * q.low &&
                  r.high == factor * q.high))
                print_error("%s %s %.17g %.17g\n", name, utw_constant_key((utw_constant)k), r.value,
                            factor * q.value);
            assert_true(r.value == factor * q.value && r.low == factor * q.low &&
                        r.high == factor * q.high);
        }
        utw_solution_free(a);
        utw_solution_free(b);
        utw_outline_free(o);
        utw_outline_free(p);
    }
}

/* The same section at a much tighter tolerance: values agree to 1e-8, all still within the bounds.
 */
static void tight(void **state)
{
    (void)state;
    static const int some[] = {1, 4, 9, 11};
    for (size_t i = 0; i < sizeof some / sizeof *some; i++)
        check_mapping(some[i], 1e-9, 33.3, 1.7, 1, 20, -30);
}

/* Turning the order of vertices round, or beginning at another vertex, changes nothing that is
 * exact, and the rest within the bounds. */
static void other_first_vertex(void **state)
{
    (void)state;
    utw_outline *o =
        section_outline(0.3, "\"outline\":[[0,0],[57,4],[56,11],[13,9],[9,71],[1,70]]");
    utw_outline *p =
        section_outline(0.3, "\"outline\":[[13,9],[56,11],[57,4],[0,0],[1,70],[9,71]]");
    utw_solution *a = section_solve(o, 1e-6, 0), *b = section_solve(p, 1e-6, 0);
    const mapping same_place = mapping_of(0, 1, 0, 0, 0);
    compare(a, b, &same_place, 0);
    utw_solution_free(a);
    utw_solution_free(b);
    utw_outline_free(o);
    utw_outline_free(p);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(moved),
        balanced_test(turned),
        balanced_test(mirrored),
        balanced_test(scaled),
        balanced_test(scaled_by_a_power_of_two),
        balanced_test(tight),
        balanced_test(other_first_vertex),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
