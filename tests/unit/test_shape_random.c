/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shapes of random dimensions (fixed seed): those that are meant to fit are built, checked,
 * oriented and read back (shape_of); any others are built or refused with a message, and never
 * anything else. */
#include "base/vec2.h"
#include "outline/shape.h"
#include "support/shapes.h"

/* A linear congruential generator (Knuth, The Art of Computer Programming 2, 3.3.4): the same on
 * every machine. */
static double uniform(unsigned long long *state, double low, double high)
{
    *state = *state * 6364136223846793005ULL + 1442695040888963407ULL;
    return low + (high - low) * (double)(*state >> 11) / 9007199254740992.0;
}

typedef unsigned long long seed;

#define U(low, high) uniform(s, low, high)

static void valid(seed *s, int which, char *t, size_t n)
{
    const double h = U(20, 300), b = U(20, 300), w = U(0.03, 0.2) * fmin(h, b), q = U(0, 1) * 0.9;
    const double room = fmin(h / 2, b / 2) - w;
    switch (which) {
    case 0:
        snprintf(t, n, "rectangle b=%.10g h=%.10g r=%.10g", b, h, q * fmin(b, h) / 2);
        break;
    case 1:
        snprintf(t, n, "round d=%.10g", h);
        break;
    case 2:
        snprintf(t, n, "ellipse b=%.10g h=%.10g", b, h);
        break;
    case 3:
        snprintf(t, n, "polygon n=%d s=%.10g r=%.10g", (int)U(3, 20), h, q * h / 2);
        break;
    case 4:
        snprintf(t, n, "trapezium b=%.10g h=%.10g a=%.10g shift=%.10g r=%.10g", b, h, 0.8 * b,
                 U(-30, 30), q * 0.1 * fmin(b, h));
        break;
    case 5:
        snprintf(t, n, "tube d=%.10g t=%.10g", h, U(0.01, 0.49) * h);
        break;
    case 6:
        snprintf(t, n, "box h=%.10g b=%.10g t=%.10g tf=%.10g ro=%.10g", h, b, w, w * U(1, 1.5),
                 q * 0.2 * fmin(h, b));
        break;
    case 7:
        snprintf(t, n, "slit-tube d=%.10g t=%.10g gap=%.10g", h, 0.1 * h, U(0.001, 0.75) * h);
        break;
    case 8:
        snprintf(t, n, "arc-strip r=%.10g t=%.10g angle=%.10g", h, w, U(5, 350));
        break;
    case 9:
        snprintf(t, n, "angle h=%.10g b=%.10g t=%.10g tb=%.10g r=%.10g r2=%.10g", h, b, w,
                 w * U(0.7, 1.3), q * 0.6 * room, q * 0.7 * w);
        break;
    case 10:
        snprintf(t, n, "channel h=%.10g b=%.10g tf=%.10g tw=%.10g r=%.10g r2=%.10g slope=%.10g", h,
                 b, w, w * U(0.5, 1), q * 0.4 * room, q * 0.4 * w, U(0, 0.3) * 100 * w / b);
        break;
    case 11:
        snprintf(t, n,
                 "I h=%.10g b=%.10g tf=%.10g tw=%.10g r=%.10g r2=%.10g slope=%.10g b_bottom=%.10g",
                 h, b, w, w * U(0.5, 1), q * 0.4 * room, q * 0.4 * w, U(0, 0.3) * 100 * w / b,
                 b * U(1, 1.5));
        break;
    case 12:
        snprintf(t, n,
                 "tee h=%.10g b=%.10g tf=%.10g tw=%.10g r=%.10g r2=%.10g r3=%.10g slope=%.10g "
                 "slope_web=%.10g",
                 h, b, w, w, q * 0.4 * room, q * 0.4 * w, q * 0.3 * w, U(0, 0.3) * 100 * w / b,
                 U(0, 0.3) * 100 * w / h);
        break;
    case 13:
        snprintf(t, n, "zed h=%.10g b=%.10g tf=%.10g tw=%.10g r=%.10g r2=%.10g", h, b, w,
                 w * U(0.5, 1), q * 0.8 * room, q * 0.8 * w);
        break;
    case 14:
        snprintf(t, n, "cruciform h=%.10g b=%.10g t=%.10g tb=%.10g r=%.10g r2=%.10g", h, b, w,
                 w * U(0.7, 1), q * 0.9 * room, q * 0.3 * w);
        break;
    case 15:
        snprintf(t, n, "bulb b=%.10g t=%.10g c=%.10g r=%.10g angle=%.10g", h, 0.05 * h, 0.15 * h,
                 q * 0.07 * h, U(10, 45));
        break;
    case 16:
        snprintf(t, n, "hat h=%.10g b=%.10g c=%.10g t=%.10g ri=%.10g angle=%.10g", h, b, 6 * w, w,
                 q * w, U(0, 40));
        break;
    case 17:
        snprintf(t, n, "formed-channel h=%.10g b=%.10g c=%.10g t=%.10g ri=%.10g", h, b, 0.2 * w * 3,
                 0.2 * w, q * 0.3 * w);
        break;
    case 18:
        snprintf(t, n, "formed-zed h=%.10g b=%.10g c=%.10g t=%.10g ri=%.10g", h, b, 0.2 * w * 3,
                 0.2 * w, q * 0.3 * w);
        break;
    case 19:
        snprintf(t, n, "keyed-shaft d=%.10g b=%.10g t=%.10g r=%.10g n=%d bore=%.10g", h, 0.25 * h,
                 0.1 * h * U(1, 1.5), q * 0.05 * h, (int)U(1, 4), q * 0.6 * h);
        break;
    default:
        snprintf(t, n, "splined-shaft n=%d d=%.10g D=%.10g b=%.10g r=%.10g bore=%.10g",
                 (int)U(2, 9), h, h * U(1.1, 1.3), 0.2 * h * U(0.5, 1), q * 0.02 * h, q * 0.9 * h);
        break;
    }
}

static void valid_dimensions_make_sound_outlines(void **state)
{
    (void)state;
    seed s = 20240607;
    for (int which = 0; which < utw_shape_count(); which++)
        for (int i = 0; i < 40; i++) {
            char text[300];
            utw_error err;
            utw_outline *o = NULL;
            valid(&s, which, text, sizeof text);
            const utw_status st = shape_try(text, NULL, &o, &err);
            if (st != UTW_OK) print_error("%s\n%s\n", text, err.text);
            assert_int_equal(st, UTW_OK);
            utw_outline_free(o);
            utw_outline_free(shape_of(text));
        }
}

/* Any dimensions at all, in and out of range, some left out. */
static void arbitrary_dimensions_are_built_or_refused(void **state)
{
    (void)state;
    seed seeds = 7, *s = &seeds;
    int built = 0, refused = 0;
    for (int i = 0; i < 20000; i++) {
        const utw_shape *shape = utw_shape_at(i % utw_shape_count());
        const char *keys[UTW_SHAPE_DIMENSIONS];
        double values[UTW_SHAPE_DIMENSIONS];
        int n = 0, extreme = shape == &utw_shape_trapezium; /* its shift may flatten it */
        for (int k = 0; k < shape->n_dimension; k++) {
            if (!shape->dimension[k].required && U(0, 1) < 0.5) continue;
            keys[n] = shape->dimension[k].key;
            values[n] = pow(10, U(-1.2, 2.2));
            if (U(0, 1) < 0.02) values[n] = 0;
            if (U(0, 1) < 0.04) {
                values[n] = (U(0, 1) < 0.5 ? 1e9 : 1e-9) * U(-1, 1);
                extreme = 1;
            }
            if (shape->dimension[k].unit == UTW_SHAPE_IN_COUNT) values[n] = floor(values[n]);
            n++;
        }
        utw_error err;
        utw_outline *o = NULL;
        const utw_status st =
            utw_outline_from_shape(shape->name, n, keys, values, "mm N", NULL, &o, &err);
        if (st == UTW_OK) {
            assert_non_null(o);
            built++;
            utw_outline_free(o);
        } else {
            assert_null(o);
            assert_true(st == UTW_E_OUTLINE || st == UTW_E_SYNTAX);
            /* the shape's own checks miss only what is out of all proportion; the outline's check
             * finds that */
            const int by_shape = strncmp(err.text, shape->name, strlen(shape->name)) == 0;
            refused += !by_shape;
            if (!by_shape && !extreme) {
                print_message("%s:", shape->name);
                for (int k = 0; k < n; k++) print_message(" %s=%.10g", keys[k], values[k]);
                print_message("\n   %s\n", err.text);
            }
            assert_true(by_shape || extreme);
        }
    }
    assert_true(built > 1000 && refused > 0);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(valid_dimensions_make_sound_outlines),
        balanced_test(arbitrary_dimensions_are_built_or_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
