/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/outline.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

/* One of everything. */
static const char *const full =
    "{\"name\": \"Corner bracket\", \"units\": \" mm  N \","
    " \"loads\": [{\"name\": \"hook\", \"Vy\": -1500, \"at\": [30, 0], \"Mx\": 2.0e5},"
    "             {\"name\": \"all\", \"N\": 1, \"Vx\": 2, \"Vy\": 3, \"T\": 4, \"Mx\": 5, \"My\": "
    "6, \"B\": 7}],"
    " \"parts\": [{\"material\": \"6082\","
    "              \"outline\": [[0,100], [20,100], {\"at\": [20,20], \"round\": 6}, {\"at\": "
    "[100,20], \"bulge\": -0.1},"
    "                            {\"at\": [100,0], \"arc\": [108,10]}, {\"at\": [0,0], \"bezier\": "
    "[[60,-3],[30,3]]}],"
    "              \"holes\": [{\"circle\": [10,10,4]}, [{\"at\": [60,5], \"chamfer\": "
    "1},[70,5],{\"at\": [65,10], \"through\": [[69,7],[68,9]]}]]},"
    "             {\"outline\": {\"ellipse\": [10, 10, 4, 4, 30]}, \"material\": \"steel\"}],"
    " \"materials\": {\"steel\": {\"E\": 210000, \"nu\": 0.3},"
    "                \"6082\": {\"E\": 70000, \"nu\": 0.33, \"density\": 2.7e-6, \"yield\": 250}}}";

static void everything_is_read(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(full);
    assert_string_equal(utw_outline_name(o), "Corner bracket");
    assert_string_equal(utw_outline_units(o), "mm N");
    assert_string_equal(o->length_unit, "mm");
    assert_string_equal(o->force_unit, "N");
    assert_int_equal(o->n_material, 2);
    assert_string_equal(o->material[1].name, "6082");
    assert_true(o->material[1].E == 70000 && o->material[1].nu == 0.33);
    assert_true(o->material[1].density == 2.7e-6 && o->material[1].yield == 250);
    assert_true(isnan(o->material[0].density) && isnan(o->material[0].yield));
    assert_int_equal(o->n_part, 2);
    assert_int_equal(o->part[0].material, 1);
    assert_int_equal(o->part[1].material, 0);
    assert_int_equal(o->part[0].n_loop, 3);
    assert_int_equal(o->part[0].loop[0].n, 7);
    assert_int_equal(o->part[0].loop[2].n,
                     6); /* three edges, one of three pieces, and the chamfer */
    assert_int_equal(o->n_load, 2);
    const utw_load *hook = &o->load[0], *all = &o->load[1];
    assert_true(hook->has_at && hook->at[0] == 30 && hook->at[1] == 0 && hook->Vy == -1500 &&
                hook->Mx == 2e5);
    assert_true(hook->Vx == 0 && hook->N == 0 && hook->B == 0);
    assert_true(!all->has_at && all->N == 1 && all->Vx == 2 && all->Vy == 3 && all->T == 4);
    assert_true(all->Mx == 5 && all->My == 6 && all->B == 7);
    utw_outline_free(o);
}

static void material_lies_on_the_left(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(full);
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++) {
            const utw_loop *loop = &o->part[p].loop[l];
            assert_true((utw_loop_area(loop) > 0) == (l == 0));
            for (int k = 0; k < loop->n; k++)
                assert_memory_equal(loop->curve[k].to, loop->curve[(k + 1) % loop->n].from,
                                    sizeof(double[2]));
        }
    utw_outline_free(o);
}

static void the_box_holds_curves_not_only_vertices(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(
        "{\"units\":\"in "
        "lbf\",\"parts\":[{\"outline\":[[0,0],{\"at\":[4,0],\"bulge\":0.5},[4,3],[0,3]]}]}");
    assert_close_scaled(o->box[0], 0, 1e-15, 1);
    assert_close(o->box[1], -1, 1e-14); /* sagitta = bulge * chord / 2 */
    assert_close(o->box[2], 4, 1e-15);
    assert_close(o->box[3], 3, 1e-15);
    utw_outline_free(o);
}

static void a_missing_name_is_empty(void **state)
{
    (void)state;
    utw_outline *o =
        utw_outline_of("{\"units\":\"m kN\",\"parts\":[{\"outline\":{\"circle\":[0,0,1.5]}}]}");
    assert_string_equal(utw_outline_name(o), "");
    assert_int_equal(o->part[0].material, -1);
    assert_int_equal(o->n_load + o->n_material, 0);
    utw_outline_free(o);
}

static void wrong_arguments_are_refused(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    assert_int_equal(utw_outline_parse(NULL, 0, "x", &o, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_parse("{}", 2, NULL, &o, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_parse("{}", 2, "x", NULL, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_read(NULL, &o, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_parse("{}", 2, "x", &o, NULL),
                     UTW_E_SYNTAX); /* an error may be NULL */
    assert_null(o);
}

static const char *const parametric =
    "{\"units\": \"mm N\", \"let\": {\"t\": 4, \"b\": \"60 - 2*t\", \"E\": 70000},"
    " \"materials\": {\"alloy\": {\"E\": \"E\", \"nu\": \"1/3\"}},"
    " \"parts\": [{\"material\": \"alloy\","
    " \"outline\": [[0,0], [\"b\",0], {\"at\": [\"b\", \"b/2\"], \"round\": \"t/2\"}, [0, "
    "\"b/2\"]],"
    " \"holes\": [{\"circle\": [\"b/2\", \"b/4\", \"t\"]}]}],"
    " \"loads\": [{\"name\": \"pull\", \"N\": \"E/1000\"}]}";

static void numbers_may_be_expressions(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(parametric);
    assert_close(o->box[2], 52, 1e-15);
    assert_close(utw_loop_area(&o->part[0].loop[0]), 52 * 26 - (1 - UTW_PI / 4) * 4, 1e-14);
    assert_close(utw_loop_area(&o->part[0].loop[1]), -UTW_PI * 16, 1e-14);
    assert_true(o->material[0].E == 70000 && o->material[0].nu == 1.0 / 3 && o->load[0].N == 70);
    utw_outline_free(o);
    o = utw_outline_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0, 0, \"25.4/2\"]}}]}");
    assert_close(o->box[2], 12.7, 1e-15);
    assert_int_equal(utw_outline_dimension_count(o), 0);
    utw_outline_free(o);
}

static void dimensions_may_be_set_from_outside(void **state)
{
    (void)state;
    const char *const set[] = {"t=5", "E=2*35500"};
    utw_outline *o = NULL;
    utw_error err;
    assert_ok(utw_outline_parse_with(parametric, strlen(parametric), "test", 2, set, &o, &err));
    assert_close(o->box[2], 50, 1e-15);
    assert_true(o->material[0].E == 71000);
    assert_int_equal(utw_outline_dimension_count(o), 3);
    double value;
    int is_set;
    assert_string_equal(utw_outline_dimension(o, 0, &value, &is_set), "t");
    assert_true(value == 5 && is_set == 1);
    assert_string_equal(utw_outline_dimension(o, 1, &value, &is_set), "b");
    assert_true(value == 50 && is_set == 0);
    assert_string_equal(utw_outline_dimension(o, 2, NULL, NULL), "E");
    assert_null(utw_outline_dimension(o, 3, &value, &is_set));
    assert_null(utw_outline_dimension(o, -1, &value, &is_set));
    utw_outline_free(o);
}

static void wrong_settings_are_refused(void **state)
{
    (void)state;
    const struct {
        const char *text, *set;
        utw_status status;
        const char *message;
    } row[] = {
        {parametric, "t", UTW_E_ARGUMENT, "test: \"t\" must be NAME=VALUE, such as t=5"},
        {parametric, "r=5", UTW_E_ARGUMENT,
         "test: \"r=5\": unknown name \"r\"; define it in \"let\""},
        {parametric, "t=b", UTW_E_SYNTAX,
         "test: dimension \"b\": \"60 - 2*t\" needs \"t\", whose own value needs this one; break "
         "the circle"},
        {parametric, "t=5 mm", UTW_E_SYNTAX,
         "test: dimension \"t\": \"5 mm\" is not understood from its character 3 on: \"mm\""},
        {full, "t=5", UTW_E_ARGUMENT,
         "test: \"t=5\" cannot be set; the section has no named dimensions (\"let\")"},
    };
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++) {
        utw_outline *o = NULL;
        utw_error err;
        assert_int_equal(utw_outline_parse_with(row[i].text, strlen(row[i].text), "test", 1,
                                                &row[i].set, &o, &err),
                         row[i].status);
        assert_string_equal(err.text, row[i].message);
    }
    const char *const none[] = {NULL};
    utw_outline *o = NULL;
    assert_int_equal(utw_outline_parse_with(full, strlen(full), "test", 1, none, &o, NULL),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_parse_with(full, strlen(full), "test", 1, NULL, &o, NULL),
                     UTW_E_ARGUMENT);
}

static void let_memory_run_out(const char *text)
{
    utw_outline *o = NULL;
    for (long n = 1; o == NULL; n++) {
        utw_error err;
        const long before = utw_memory_live();
        utw_memory_fail_at(n);
        const utw_status st = utw_outline_parse(text, strlen(text), "test", &o, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(o);
        assert_int_equal(utw_memory_live(), before);
    }
    utw_outline_free(o);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    let_memory_run_out(full);
    let_memory_run_out(parametric);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(everything_is_read),
        balanced_test(material_lies_on_the_left),
        balanced_test(the_box_holds_curves_not_only_vertices),
        balanced_test(a_missing_name_is_empty),
        balanced_test(wrong_arguments_are_refused),
        balanced_test(numbers_may_be_expressions),
        balanced_test(dimensions_may_be_set_from_outside),
        balanced_test(wrong_settings_are_refused),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
