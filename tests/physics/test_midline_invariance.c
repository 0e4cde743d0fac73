/* SPDX-License-Identifier: GPL-3.0-or-later
 * The midline found does not depend on how the section lies in the plane, on its size, or on how
 * densely its boundary is sampled. */
#include "support/mapping.h"
#include "support/shapes.h"

#include "thinwall/idealise.h"

static const char *const shapes[] = {
    "angle h=100 b=65 t=10 r=10 r2=5",
    "box h=100 b=60 t=6 ro=9 ri=6",
    "channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8",
    "I h=200 b=100 tf=8.5 tw=5.6 r=12",
    "tee h=100 b=80 tf=11 tw=9 r=11",
    "formed-zed h=200 b=70 c=20 t=2 ri=4",
    "hat h=60 b=60 c=30 t=3 ri=4",
    "slit-tube d=100 t=5 gap=2",
    "tube d=60.3 t=4",
};

static void compare(const utw_idealisation *a, const utw_idealisation *b, double scale, double rtol)
{
    const utw_thin_constants *p = utw_thin_get(utw_idealisation_thin(a)),
                             *q = utw_thin_get(utw_idealisation_thin(b));
    const utw_idealisation_info *i = utw_idealisation_get(a), *k = utw_idealisation_get(b);
    const double s2 = scale * scale, r4 = pow(p->I1 / p->A, 2);
    assert_int_equal(i->walls, k->walls);
    assert_int_equal(i->bends, k->bends);
    assert_int_equal(i->links, k->links);
    assert_int_equal(i->cells, k->cells);
    assert_close(q->A, s2 * p->A, rtol);
    assert_close(q->I1, s2 * s2 * p->I1, rtol);
    assert_close_scaled(q->I2, s2 * s2 * p->I2, rtol, s2 * s2 * p->I1);
    assert_close(q->J, s2 * s2 * p->J, rtol);
    assert_close_scaled(q->Iw, s2 * s2 * s2 * p->Iw, rtol, s2 * s2 * s2 * p->A * r4);
    assert_close_scaled(k->area_share, i->area_share, 0.02, 1);
}

static utw_idealisation *ideal_of(utw_outline *outline, double density)
{
    utw_error err;
    utw_idealisation *ideal = NULL;
    assert_ok(utw_idealise_with(outline, density, &ideal, &err));
    return ideal;
}

static void moved(void **state)
{
    (void)state;
    const mapping map[] = {
        mapping_of(21.3, 1, 0, 0, 0),        mapping_of(90, 1, 0, 700, -300),
        mapping_of(0, 0.00237, 0, 0.1, 0.3), mapping_of(0, 1, 1, 0, 0),
        mapping_of(137, 25.4, 1, -9, 4),
    };
    const double scale[] = {1, 1, 0.00237, 1, 25.4};
    for (size_t s = 0; s < sizeof shapes / sizeof *shapes; s++) {
        utw_outline *plain = shape_of(shapes[s]);
        utw_idealisation *first = ideal_of(plain, 1);
        for (size_t m = 0; m < sizeof map / sizeof *map; m++) {
            utw_outline *other = shape_of(shapes[s]);
            mapping_apply(&map[m], other);
            utw_idealisation *second = ideal_of(other, 1);
            compare(first, second, scale[m], 1e-6);
            utw_idealisation_free(second);
            utw_outline_free(other);
        }
        utw_idealisation_free(first);
        utw_outline_free(plain);
    }
}

static void sampled_twice_as_densely(void **state)
{
    (void)state;
    for (size_t s = 0; s < sizeof shapes / sizeof *shapes; s++) {
        utw_outline *outline = shape_of(shapes[s]);
        utw_idealisation *first = ideal_of(outline, 1), *second = ideal_of(outline, 2);
        compare(first, second, 1, 1e-4);
        utw_idealisation_free(first);
        utw_idealisation_free(second);
        utw_outline_free(outline);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(moved),
        balanced_test(sampled_twice_as_densely),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
