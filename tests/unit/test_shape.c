/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/shape.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void the_list_is_complete_and_its_table_sound(void **state)
{
    (void)state;
    utw_error err;
    utw_shape_info info;
    assert_int_equal(utw_shape_count(), 21);
    for (int i = 0; i < utw_shape_count(); i++) {
        assert_ok(utw_shape_get_info(i, &info, &err));
        assert_ptr_equal(utw_shape_find(info.name), utw_shape_at(i));
        assert_true(strlen(info.meaning) > 0 && strlen(info.origin) > 0);
        assert_true(info.n_dimension > 0 && info.n_dimension <= UTW_SHAPE_DIMENSIONS);
        assert_true(info.drawing[strlen(info.drawing) - 1] == '\n');
        for (int k = 0; k < info.n_dimension; k++) {
            const utw_shape_dimension *d = &info.dimension[k];
            assert_true(strlen(d->key) > 0 && strlen(d->meaning) > 0);
            assert_true(d->least < d->greatest);
            /* a default is in range or described */
            if (d->required) assert_true(isnan(d->fallback));
            if (!d->required && isnan(d->fallback)) assert_true(strlen(d->otherwise) > 0);
            if (!d->required && !isnan(d->fallback))
                assert_true(d->fallback >= d->least && d->fallback <= d->greatest);
            for (int j = 0; j < k; j++) assert_string_not_equal(d->key, info.dimension[j].key);
        }
    }
    assert_int_equal(utw_shape_get_info(-1, &info, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_shape_get_info(utw_shape_count(), &info, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "there is no shape 21: 0 to 20");
    assert_null(utw_shape_find("Channel"));
}

/* Every letter of a drawing's dimensions is in the drawing. */
static void drawings_show_their_dimensions(void **state)
{
    (void)state;
    for (int i = 0; i < utw_shape_count(); i++) {
        const utw_shape *shape = utw_shape_at(i);
        for (int k = 0; k < shape->n_dimension; k++) {
            const char *key = shape->dimension[k].key;
            if (strcmp(key, "slope_deg") == 0) continue; /* another measure of slope */
            int found = 0;
            for (const char *p = strstr(shape->drawing, key); p != NULL && !found;
                 p = strstr(p + 1, key)) {
                const char after = p[strlen(key)], before = p > shape->drawing ? p[-1] : ' ';
                found = !((after >= 'a' && after <= 'z') || (before >= 'a' && before <= 'z'));
            }
            if (!found) print_error("%s: %s\n", shape->name, key);
            assert_true(found);
        }
    }
}

static void wrong_names_are_named(void **state)
{
    (void)state;
    shape_refused("chanel h=1", UTW_E_SYNTAX,
                  "there is no shape \"chanel\"; did you mean \"channel\"?");
    shape_refused(
        "sausage h=1", UTW_E_SYNTAX,
        "there is no shape \"sausage\"; there are rectangle, round, ellipse, polygon, trapezium, "
        "tube, box, "
        "slit-tube, arc-strip, angle, channel, I, tee, zed, cruciform, bulb, hat, formed-channel, "
        "formed-zed, keyed-shaft, splined-shaft");
    shape_refused("tube d=47.7 T=3", UTW_E_SYNTAX,
                  "tube: there is no dimension \"T\"; it has d, t");
    shape_refused("tube d=47.7", UTW_E_SYNTAX,
                  "tube: t (wall thickness) is missing: it needs a value");
    shape_refused("tube d=47.7 t=3 d=47.7", UTW_E_SYNTAX, "tube: d is given twice");
    shape_refused("tube d=47.7 t=nan", UTW_E_OUTLINE, "tube: t is not a finite number");
    shape_refused("tube d=inf t=3", UTW_E_OUTLINE, "tube: d is not a finite number");
    shape_refused("tube d=2e9 t=3", UTW_E_OUTLINE,
                  "tube: d = 2000000000 must be at most 1000000000");
}

static void arguments_are_checked(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    const char *keys[] = {"d", NULL};
    const double values[] = {20, 3};
    assert_int_equal(utw_outline_from_shape(NULL, 0, NULL, NULL, "mm N", NULL, &o, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", 2, NULL, values, "mm N", NULL, &o, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", 2, keys, NULL, "mm N", NULL, &o, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", -1, keys, values, "mm N", NULL, &o, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", 1, keys, values, NULL, NULL, &o, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", 1, keys, values, "mm N", NULL, NULL, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_shape("tube", 2, keys, values, "mm N", NULL, &o, &err),
                     UTW_E_SYNTAX);
    assert_string_equal(err.text, "tube: there is no dimension \"\"; it has d, t");
    assert_int_equal(utw_outline_from_shape("round", 1, keys, values, "N mm", NULL, &o, &err),
                     UTW_E_SYNTAX);
    assert_string_equal(err.text, "units is \"N mm\"; the length comes first: \"mm N\"");
    const utw_placement nowhere = {.at = {NAN, 0}}, far_off = {.at = {1e300, 0}};
    assert_int_equal(utw_outline_from_shape("round", 1, keys, values, "mm N", &nowhere, &o, &err),
                     UTW_E_OUTLINE);
    assert_int_equal(utw_outline_from_shape("round", 1, keys, values, "mm N", &far_off, &o, &err),
                     UTW_E_OUTLINE);
    assert_int_equal(utw_outline_from_shape("tube", 1, keys, values, "mm N", NULL, &o, NULL),
                     UTW_E_SYNTAX);
    assert_null(o);
    assert_ok(utw_outline_from_shape("round", 1, keys, values, "in  lbf", NULL, &o, &err));
    assert_string_equal(utw_outline_units(o), "in lbf");
    assert_string_equal(utw_outline_name(o), "round d=20");
    assert_true(o->box[0] == -10 && o->box[3] == 10);
    assert_int_equal(o->part[0].material, -1);
    utw_outline_free(o);
}

/* A limit that a message prints is one that fits (more or less than: next to it). */
static void printed_limits_fit(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    static const char *const refused[] = {
        "channel h=99.7 b=51.3 tf=8.57 tw=6.1 slope=7.3 r=%.17g",
        "angle h=99.7 b=61.3 t=8.57 r2=3 r=%.17g",
        "polygon n=7 d=23.3 r=%.17g",
        "splined-shaft n=6 d=23.1 D=28.9 b=5.7 r=%.17g",
        "bulb b=201 t=9.3 c=27.1 angle=28 r=%.17g",
        "hat h=61 b=83 c=27 t=2.3 angle=11 ri=%.17g",
    };
    for (size_t i = 0; i < sizeof refused / sizeof *refused; i++) {
        char text[200], copy[100];
        snprintf(copy, sizeof copy, "%.*s", (int)(strlen(refused[i]) - strlen("%.17g")),
                 refused[i]);
        snprintf(text, sizeof text, "%s%.17g", copy, 1000.0);
        assert_int_equal(shape_try(text, NULL, &o, &err), UTW_E_OUTLINE);
        const char *at_most = strstr(err.text, "at most ");
        assert_non_null(at_most);
        const double limit = strtod(at_most + strlen("at most "), NULL);
        snprintf(text, sizeof text, "%s%.17g", copy, limit);
        assert_ok(shape_try(text, NULL, &o, &err));
        utw_outline_free(o);
        o = NULL;
        snprintf(text, sizeof text, "%s%.17g", copy, limit * 1.0001);
        assert_int_equal(shape_try(text, NULL, &o, &err), UTW_E_OUTLINE);
    }
}

static void placed_shapes_are_the_same_shapes(void **state)
{
    (void)state;
    utw_error err;
    static const char *const text[] = {
        "channel h=100 b=50 tf=8.5 tw=6 r=8.5 slope=8", "slit-tube d=47.7 t=3.25 gap=2.4",
        "box h=60 b=40 t=3 ro=6", "ellipse b=40 h=13", "splined-shaft n=6 d=23 D=28 b=6 r=0.5"};
    for (size_t i = 0; i < sizeof text / sizeof *text; i++) {
        utw_outline *o = shape_of(text[i]), *p = NULL;
        const figure a = figure_of_outline(o);
        const utw_placement place = {.at = {3, -7}, .turn = 0.7, .mirror = 1};
        assert_ok(shape_try(text[i], &place, &p, &err));
        /* x' = 3 - c x - s y, y' = -7 - s x + c y (elementary) */
        const double c = cos(0.7), s = sin(0.7), A = a.A;
        const double ox = -c * a.x - s * a.y, oy = -s * a.x + c * a.y;
        const double oxx = c * c * a.xx + 2 * s * c * a.xy + s * s * a.yy;
        const double oyy = s * s * a.xx - 2 * s * c * a.xy + c * c * a.yy;
        const double oxy = s * c * (a.xx - a.yy) + (s * s - c * c) * a.xy;
        const figure expected = {A,
                                 ox + 3 * A,
                                 oy - 7 * A,
                                 oxx + 6 * ox + 9 * A,
                                 oyy - 14 * oy + 49 * A,
                                 oxy - 7 * ox + 3 * oy - 21 * A};
        assert_figure(figure_of_outline(p), expected, 1e-12);
        for (int k = 0; k < p->part[0].n_loop; k++)
            assert_true((utw_loop_area(&p->part[0].loop[k]) > 0) == (k == 0));
        utw_outline_free(o);
        utw_outline_free(p);
    }
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    static const char *const text[] = {"box h=60 b=40 t=3 ro=6",
                                       "splined-shaft n=6 d=23 D=28 b=6 r=0.5 bore=5"};
    for (int i = 0; i < 2; i++) {
        utw_error err;
        utw_outline *o = NULL;
        utw_status st = UTW_E_NOMEM;
        long n = 0;
        while (st == UTW_E_NOMEM) {
            utw_memory_fail_at(++n);
            st = shape_try(text[i], NULL, &o, &err);
            utw_memory_fail_at(0);
            if (st != UTW_OK) assert_null(o);
        }
        assert_int_equal(st, UTW_OK);
        assert_true(n > 10);
        utw_outline_free(o);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_list_is_complete_and_its_table_sound),
        balanced_test(drawings_show_their_dimensions),
        balanced_test(wrong_names_are_named),
        balanced_test(arguments_are_checked),
        balanced_test(printed_limits_fit),
        balanced_test(placed_shapes_are_the_same_shapes),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
