/* SPDX-License-Identifier: GPL-3.0-or-later
 * Outlines that are hard to mesh: thin walls, hairs, slits, needles, teeth, perforations. Each must
 * be solved to the tolerance with few unknowns, brackets of a rough solution must contain those of
 * a fine one, and J must be what hand calculation gives where there is one. */
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

#include "base/vec2.h"
#include "support/section.h"

enum { TEXT = 1 << 15 };

typedef struct text {
    char s[TEXT];
    size_t n;
} text;

static void add(text *t, const char *format, ...) __attribute__((format(printf, 2, 3)));
static void add(text *t, const char *format, ...)
{
    va_list list;
    va_start(list, format);
    t->n += (size_t)vsnprintf(t->s + t->n, TEXT - t->n, format, list);
    va_end(list);
    assert_true(t->n < TEXT);
}

/* Every bracket of the fine solution lies in that of the rough one, but for rounding. */
static void check_nested(const utw_solution *rough, const utw_solution *fine)
{
    static const utw_constant list[] = {UTW_J,   UTW_XS,  UTW_YS, UTW_XF,    UTW_YF,
                                        UTW_ASX, UTW_ASY, UTW_R0, UTW_BETAX, UTW_BETAY};
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        const utw_quantity r = section_constant(rough, (int)list[i]),
                           f = section_constant(fine, (int)list[i]);
        const double slack = 1e-9 * fmax(fabs(f.value), f.high - f.low) + 1e-9;
        assert_true(r.low <= f.high + slack && f.low <= r.high + slack);
        assert_true(f.high - f.low <= (r.high - r.low) + slack);
    }
}

/* Solved at 1e-3 and at 1e-6 with at most `most` unknowns; J within `rtol` of `J` (0: not known).
 */
static void check(const char *part, int most, double J, double rtol)
{
    utw_outline *o = section_outline(0.3, "%s", part);
    utw_solution *rough = section_solve(o, 1e-3, 0), *fine = section_solve(o, 1e-6, 0);
    utw_solution_info info;
    utw_solution_get_info(fine, &info);
    assert_true(info.reached);
    if (info.unknowns > most) print_error("%d unknowns for %.60s\n", info.unknowns, part);
    assert_true(info.unknowns <= most);
    check_nested(rough, fine);
    if (J > 0) assert_close(section_constant(fine, UTW_J).value, J, rtol);
    utw_solution_free(rough);
    utw_solution_free(fine);
    utw_outline_free(o);
}

static void thin_walls(void **state)
{
    (void)state;
    /* channel, walls 0.4 of 200 lengths: sum b t^3/3 over the middle lines, ends 0.105 t^4 each
     * (Timoshenko and Goodier, art. 109), corners less: 1e-3 */
    check("\"outline\": [[0,0], [80,0], [80,0.4], [0.4,0.4], [0.4,119.6], [80,119.6], [80,120], "
          "[0,120]]",
          12000, (2 * 79.8 + 119.6) * 0.4 * 0.4 * 0.4 / 3, 1e-3);
    /* tube of wall 1/200: pi/2 (a^4 - b^4) */
    check("\"outline\": {\"circle\": [0,0,100]}, \"holes\": [{\"circle\": [0,0,99.5]}]", 16000,
          UTW_PI / 2 * (1e8 - pow(99.5, 4)), 1e-6);
    /* a disc with a hole off centre, 0.1 left between them */
    check("\"outline\": {\"circle\": [0,0,100]}, \"holes\": [{\"circle\": [9.9,0,90]}]", 8000, 0,
          0);
    check("\"outline\": [[0,0], [40,0], [40,20], [0,20]], \"holes\": [{\"circle\": [15,10,9.99]}]",
          8000, 0, 0);
}

static void needles(void **state)
{
    (void)state;
    /* a thin wedge: int h(x)^3/3 dx = l h^3/12 (membrane analogy), less the effect of the base,
     * 0.105 h^4 */
    check("\"outline\": [[0,0], [100,-0.1], [100,0.1]]", 600,
          100 * pow(0.2, 3) / 12 - 0.105 * pow(0.2, 4), 1e-4);
    check("\"outline\": [[0,0], [100,-1], [100,1]]", 1500, 100 * 8.0 / 12 - 0.105 * 16, 1e-2);
    /* an ellipse of axes 100 and 1: pi a^3 b^3/(a^2 + b^2) */
    check("\"outline\": {\"ellipse\": [0,0,50,0.5,0]}", 1500, UTW_PI * pow(25, 3) / (2500 + 0.25),
          1e-8);
}

static void slits_and_scratches(void **state)
{
    (void)state;
    const double half[] = {0.1, 0.001};
    for (size_t i = 0; i < sizeof half / sizeof *half; i++) {
        text t = {"", 0};
        add(&t, "\"outline\": [[20,%.17g], [20,20], [-20,20], [-20,-20], [20,-20], [20,%.17g], ",
            half[i], -half[i]);
        add(&t, "[0,%.17g], [0,%.17g]]", -half[i], half[i]);
        check(t.s, 8000, 0, 0);
        t.n = 0;
        add(&t,
            "\"outline\": [[20,%.17g], {\"at\": [-20,0], \"arc\": [0,20]}, {\"at\": [20,%.17g], "
            "\"arc\": [0,-20]}, ",
            half[i], -half[i]);
        add(&t,
            "[16,%.17g], {\"at\": [-16,0], \"arc\": [0,-16]}, {\"at\": [16,%.17g], "
            "\"arc\": [0,16]}]",
            -half[i], half[i]);
        /* slit tube: 2 pi r t^3/3 less the ends, 0.105 t^4 each */
        check(t.s, 2500, 2 * UTW_PI * 18 * 64 / 3 - 2 * 0.105 * 256 - 2 * half[i] * 64 / 3, 1e-2);
    }
    check("\"outline\": [[0,0], [50,0], [50,20], [25.01,20], [25,19.9], [24.99,20], [0,20]]", 3000,
          0, 0);
    check("\"outline\": [[0,0], [100,0], [100,20], {\"at\": [20,20], \"round\": 0.01}, [20,100], "
          "[0,100]]",
          4000, 0, 0);
    check("\"outline\": [[0,0], [50,0], [50,10], [30,10], [30,10.05], [10,10.05], [10,10], [0,10]]",
          4000, 0, 0);
}

static void teeth(void **state)
{
    (void)state;
    text t = {"", 0};
    add(&t, "\"outline\": [[0,0], [80,0]");
    for (int i = 7; i >= 0; i--) {
        add(&t, ", [%d,5], [%d,5]", 10 * i + 10, 10 * i + 3);
        add(&t, ", [%d,40], [%d,40]", 10 * i + 3, 10 * i);
    }
    add(&t, "]");
    check(t.s, 40000, 0, 0);
    t.n = 0;
    for (int i = 0; i < 14; i++) { /* a star of seven sharp points */
        const double r = i % 2 == 0 ? 30 : 4, a = UTW_PI * i / 7;
        add(&t, i == 0 ? "\"outline\": [[%.17g,%.17g]" : ", [%.17g,%.17g]", r * cos(a), r * sin(a));
    }
    add(&t, "]");
    check(t.s, 40000, 0, 0);
}

static void many_holes_and_many_sides(void **state)
{
    (void)state;
    text t = {"", 0};
    add(&t, "\"outline\": [[0,0], [66,0], [66,30], [0,30]], \"holes\": [");
    for (int i = 0; i < 21; i++) {
        add(&t, i == 0 ? "{\"circle\": [%.17g,%.17g,3]}" : ", {\"circle\": [%.17g,%.17g,3]}",
            6.0 + 9 * (i / 3), 7.5 + 7.5 * (i % 3));
    }
    add(&t, "]");
    check(t.s, 16000, 0, 0);
    t.n = 0;
    enum { SIDES = 300 };
    for (int i = 0; i < SIDES; i++) {
        const double a = 2 * UTW_PI * i / SIDES;
        add(&t, i == 0 ? "\"outline\": [[%.17g,%.17g]" : ", [%.17g,%.17g]", 30 * cos(a),
            30 * sin(a));
    }
    add(&t, "]");
    check(t.s, 12000, UTW_PI / 2 * pow(30, 4), 3e-4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(thin_walls),
        balanced_test(needles),
        balanced_test(slits_and_scratches),
        balanced_test(teeth),
        balanced_test(many_holes_and_many_sides),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
