/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "bar/along.h"

#include "support/support.h"

static void stations_cover_the_bar(void **state)
{
    (void)state;
    static const double at[] = {NAN, 0, 700, 260.5, 1e-3}, fade[] = {0, 1e-5, 12, 90, 1e9};
    for (int a = 0; a < 5; a++)
        for (int f = 0; f < 5; f++) {
            utw_stations s;
            utw_stations_spread(&s, 700, at[a], fade[f]);
            assert_true(s.n >= 17 && s.n <= UTW_STATIONS);
            assert_true(s.z[0] == 0 && s.z[s.n - 1] == 700);
            int pieces = 0;
            for (int i = 0; i < s.n; i++) {
                pieces += s.begins[i];
                if (i > 0) assert_true(s.z[i] > s.z[i - 1]);
                if (i > 0 && s.begins[i]) {
                    assert_true(s.z[i - 1] == at[a]);
                    assert_true(s.z[i] == nextafter(at[a], 700));
                }
            }
            assert_int_equal(pieces, a < 3 ? 1 : 2);
        }
    /* what fades fast is seen */
    utw_stations s;
    utw_stations_spread(&s, 700, NAN, 2);
    assert_true(s.z[1] == 1 && s.z[2] == 2);
}

static utw_status hill(const void *context, double z, double *value, utw_error *err)
{
    const double d = z - *(const double *)context;
    (void)err;
    *value = 5 - d * d;
    return UTW_OK;
}

static utw_status step(const void *context, double z, double *value, utw_error *err)
{
    (void)err;
    *value = z <= *(const double *)context ? z : -z;
    return UTW_OK;
}

static utw_status nothing(const void *context, double z, double *value, utw_error *err)
{
    (void)context;
    (void)value;
    if (z > 300) return utw_fail(err, UTW_E_NOMEM, "at %g", z);
    *value = 0;
    return UTW_OK;
}

static void the_greatest_value_is_found(void **state)
{
    (void)state;
    utw_error err;
    static const double peak[] = {0, 3.7, 261, 699.2, 700, 260.99, 261.01};
    utw_stations s;
    double z, value;
    utw_stations_spread(&s, 700, 261, 10);
    for (int i = 0; i < 7; i++) {
        assert_ok(utw_along_greatest(&s, hill, &peak[i], 1e-8, &z, &value, &err));
        assert_close_scaled(z, peak[i], 1e-7, 100);
        assert_close(value, 5, 1e-12);
    }
    assert_ok(utw_along_greatest(&s, step, &peak[2], 1e-3, &z, &value, &err));
    assert_true(z == 261 && value == 261); /* on the left of the jump */
    assert_int_equal(utw_along_greatest(&s, nothing, NULL, 1e-3, &z, &value, &err), UTW_E_NOMEM);
    assert_true(value == 261);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(stations_cover_the_bar),
        cmocka_unit_test(the_greatest_value_is_found),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
