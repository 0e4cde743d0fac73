/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/let.h"

#include <fenv.h>

#include "base/memory.h"
#include "support/support.h"

static utw_let *let_of(int n, const char *const (*row)[2])
{
    utw_let *let = NULL;
    utw_error err;
    assert_ok(utw_let_create(n, &let, &err));
    for (int k = 0; k < n; k++) assert_ok(utw_let_define(let, row[k][0], row[k][1], 0, &err));
    return let;
}

static void names_are_found_in_any_order(void **state)
{
    (void)state;
    const char *const row[][2] = {
        {"b", "a + 2*c"}, {"c", "a/4"}, {"a", "2.5"}, {"long_name2", "b*c"}};
    utw_let *let = let_of(4, row);
    utw_error err;
    assert_int_equal(utw_let_define(let, "x", NULL, 0, &err), UTW_E_INTERNAL); /* no room */
    assert_ok(utw_let_resolve(let, &err));
    assert_int_equal(utw_let_count(let), 4);
    assert_string_equal(utw_let_name(let, 3), "long_name2");
    assert_close(utw_let_value(let, 0), 3.75, 1e-15);
    assert_close(utw_let_value(let, 1), 0.625, 1e-15);
    assert_close(utw_let_value(let, 3), 2.34375, 1e-15);
    double x;
    assert_ok(utw_let_evaluate(let, "b - long_name2", &x, &err));
    assert_close(x, 1.40625, 1e-15);
    assert_ok(utw_let_evaluate(let, "a", &x, &err));
    assert_true(x == 2.5);
    utw_let_free(let);
}

static void expressions_have_their_value(void **state)
{
    (void)state;
    const struct {
        const char *expression;
        double value;
    } row[] = {
        {"1/3", 1.0 / 3},
        {" -2^2 ", -4},
        {"2^3^2", 512},
        {"2.5e-3*4", 0.01},
        {"(1+2)*3-4/8", 8.5},
        {"sqrt(2)", 1.4142135623730951},
        {"abs(-2.5)", 2.5},
        {"min(3,1.5,2)", 1.5},
        {"max(3,1.5,7)", 7},
        {"floor(2.7)+ceil(2.2)", 5},
        {"hypot(3,4)", 5},
        /* degrees, as everywhere in the file; multiples of 90 exactly */
        {"sin(30)", 0.5},
        {"cos(60)", 0.5},
        {"tan(45)", 1},
        {"cos(90)", 0},
        {"sin(180)", 0},
        {"cos(-270)", 0},
        {"sin(-90)", -1},
        {"cos(180)", -1},
        {"sin(450)", 1},
        {"asin(0.5)", 30},
        {"acos(0.5)", 60},
        {"atan(1)", 45},
        {"atan2(1,-1)", 135},
        {"2*pi", 6.283185307179586},
        {"t > 4 ? 10 : 20", 10},
        {"t == 5 && t != 4", 1},
        {"t <= 4 || t >= 6", 0},
        {"-t", -5},
        {"t == 5 ? 1 : 1/(t-5)", 1}, /* what is not chosen is not computed */

        {"0.1+0.2", 0.1 + 0.2},
        {"1e-300*1e-10", 1e-310},
    };
    const char *const five[][2] = {{"t", "5"}};
    utw_let *let = let_of(1, five);
    utw_error err;
    assert_ok(utw_let_resolve(let, &err));
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++) {
        double x = NAN;
        assert_ok(utw_let_evaluate(let, row[i].expression, &x, &err));
        if (row[i].value == 0)
            assert_true(x == 0);
        else
            assert_close(x, row[i].value, 4e-16);
    }
    utw_let_free(let);
}

static void wrong_expressions_are_refused(void **state)
{
    (void)state;
    const struct {
        const char *expression, *message;
    } row[] = {
        {"", "the expression is empty"},
        {"  ", "the expression is empty"},
        {"2*", "\"2*\" ends too early; complete the expression"},
        {"(2+t", "\"(2+t\" ends too early; complete the expression"},
        {"min(2", "\"min(2\" ends too early; complete the expression"},
        {"2+*3", "\"2+*3\" is not understood from its character 3 on: \"*3\""},
        {"70000 MPa", "\"70000 MPa\" is not understood from its character 7 on: \"MPa\""},
        {"100 t", "\"100 t\" is not understood from its character 5 on: \"t\""},
        {"t = 7", "\"t = 7\" is not understood from its character 3 on: \"= 7\""},
        {"5 % 2", "\"5 % 2\" is not understood from its character 3 on: \"% 2\""},
        {"2)", "\"2)\" is not understood from its character 2 on: \")\""},
        {"2,5", "\"2,5\" has 2 values; a decimal comma must be a point"},
        {"sqrt(1,2)", "\"sqrt(1,2)\" is not understood from its character 9 on: \")\""},
        {"\xC3\xA9", "\"\xC3\xA9\" is not understood from its character 1 on: \"\xC3\xA9\""},
        {"heigth/2", "\"heigth/2\" has the unknown name \"heigth\"; did you mean \"height\"?"},
        {"width/2", "\"width/2\" has the unknown name \"width\"; define it in \"let\""},
        {"log(2)", "\"log(2)\" has the unknown name \"log\"; define it in \"let\""},
        {"1/0", "\"1/0\" divides by zero"},
        {"b/(t-5)", "\"b/(t-5)\" divides by zero"},
        {"1/(1/(t-5))", "\"1/(1/(t-5))\" divides by zero"},
        {"tan(90)", "\"tan(90)\" divides by zero"},
        {"0/(t-5)", "\"0/(t-5)\" has no value (such as 0/0, or the root of a negative number)"},
        {"sqrt(t-9)", "\"sqrt(t-9)\" has no value (such as 0/0, or the root of a negative number)"},
        {"acos(t)", "\"acos(t)\" has no value (such as 0/0, or the root of a negative number)"},
        {"10^400", "\"10^400\" is a number too large to be held (beyond 1.8e308)"},
        {"1/(1e300*1e300)",
         "\"1/(1e300*1e300)\" is a number too large to be held (beyond 1.8e308)"},
    };
    const char *const dimension[][2] = {{"t", "5"}, {"b", "60"}, {"height", "80"}};
    utw_let *let = let_of(3, dimension);
    utw_error err;
    assert_ok(utw_let_resolve(let, &err));
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++)
        for (int twice = 0; twice < 2;
             twice++) { /* a parser must not remember a failure as a value */
            double x = 77;
            assert_int_equal(utw_let_evaluate(let, row[i].expression, &x, &err), UTW_E_SYNTAX);
            assert_string_equal(err.text, row[i].message);
            assert_true(x == 77);
        }
    char longer[500];
    memset(longer, '1', 450);
    longer[450] = '\0';
    double x;
    assert_int_equal(utw_let_evaluate(let, longer, &x, &err), UTW_E_SYNTAX);
    assert_non_null(strstr(err.text, "...\" is longer than 400 characters"));
    memset(longer, '(', 400);
    longer[400] = '\0';
    assert_int_equal(utw_let_evaluate(let, longer, &x, &err), UTW_E_SYNTAX);
    utw_let_free(let);
}

static void faults_name_their_dimension(void **state)
{
    (void)state;
    const struct {
        const char *row[3][2];
        const char *message;
    } fault[] = {
        {{{"a", "b+1"}, {"b", "c*2"}, {"c", "4*d"}},
         "dimension \"c\": \"4*d\" has the unknown name \"d\"; define it in \"let\""},
        {{{"a", "b+1"}, {"b", "c*2"}, {"c", "a"}},
         "dimension \"c\": \"a\" needs \"a\", whose own value needs this one; break the circle"},
        {{{"a", "a+1"}, {"b", "2"}, {"c", "a"}},
         "dimension \"a\": \"a+1\" needs \"a\", whose own value needs this one; break the circle"},
        {{{"a", "b"}, {"b", "1/c"}, {"c", "0"}}, "dimension \"b\": \"1/c\" divides by zero"},
        {{{"a", "2"}, {"b", "a-"}, {"c", "0"}},
         "dimension \"b\": \"a-\" ends too early; complete the expression"},
    };
    for (size_t i = 0; i < sizeof fault / sizeof fault[0]; i++) {
        utw_let *let = let_of(3, fault[i].row);
        utw_error err;
        assert_int_equal(utw_let_resolve(let, &err), UTW_E_SYNTAX);
        assert_string_equal(err.text, fault[i].message);
        utw_let_free(let);
    }
}

static void names_must_be_names(void **state)
{
    (void)state;
    utw_let *let = NULL;
    utw_error err;
    assert_ok(utw_let_create(10, &let, &err));
    assert_int_equal(utw_let_define(let, "2b", NULL, 1, &err), UTW_E_SYNTAX);
    assert_string_equal(
        err.text,
        "\"2b\" is no name for a dimension; use a letter, then letters, digits and _, at most 60");
    assert_int_equal(utw_let_define(let, "", NULL, 1, &err), UTW_E_SYNTAX);
    assert_int_equal(utw_let_define(let, "a b", NULL, 1, &err), UTW_E_SYNTAX);
    assert_int_equal(utw_let_define(let, "pi", NULL, 1, &err), UTW_E_SYNTAX);
    assert_string_equal(err.text,
                        "\"pi\" already has a meaning in expressions; choose another name");
    assert_int_equal(utw_let_define(let, "max", NULL, 1, &err), UTW_E_SYNTAX);
    assert_ok(utw_let_define(let, "t", NULL, 1, &err));
    assert_int_equal(utw_let_define(let, "t", NULL, 1, &err), UTW_E_SYNTAX);
    assert_string_equal(err.text, "dimension \"t\" is defined twice; remove one");
    assert_ok(utw_let_define(let, "T", NULL, 1, &err)); /* case counts */
    utw_let_free(let);
}

static void names_are_set_from_outside(void **state)
{
    (void)state;
    const char *const row[][2] = {{"t", "4"}, {"b", "60 - 2*t"}, {"width", "1"}};
    utw_let *let = let_of(3, row);
    utw_error err;
    assert_ok(utw_let_set(let, "t = 5", &err));
    assert_ok(utw_let_set(let, "width=b/2", &err));
    assert_ok(utw_let_resolve(let, &err));
    assert_true(utw_let_value(let, 1) == 50 && utw_let_value(let, 2) == 25);
    assert_true(utw_let_is_set(let, 0) && !utw_let_is_set(let, 1) && utw_let_is_set(let, 2));
    const char *const wrong[][2] = {
        {"t=6", "\"t=6\": \"t\" is set twice"},
        {"t", "\"t\" must be NAME=VALUE, such as t=5"},
        {"=5", "\"=5\" must be NAME=VALUE, such as t=5"},
        {"t= ", "\"t= \" must be NAME=VALUE, such as t=5"},
        {"", "\"\" must be NAME=VALUE, such as t=5"},
        {"with=5", "\"with=5\": unknown name \"with\"; did you mean \"width\"?"},
        {"h=5", "\"h=5\": unknown name \"h\"; define it in \"let\""},
    };
    for (size_t i = 0; i < sizeof wrong / sizeof wrong[0]; i++) {
        assert_int_equal(utw_let_set(let, wrong[i][0], &err), UTW_E_ARGUMENT);
        assert_string_equal(err.text, wrong[i][1]);
    }
    utw_let_free(let);
}

static void a_long_chain_ends(void **state)
{
    (void)state;
    utw_let *let = NULL;
    utw_error err;
    for (int n = 40; n <= 400; n += 360) {
        assert_ok(utw_let_create(n, &let, &err));
        for (int k = 0; k < n; k++) {
            char name[12], expression[20];
            snprintf(name, sizeof name, "n%d", k);
            snprintf(expression, sizeof expression, "n%d+1", k + 1);
            assert_ok(utw_let_define(let, name, k < n - 1 ? expression : NULL, 1, &err));
        }
        const utw_status st = utw_let_resolve(let, &err);
        assert_int_equal(st, n == 40 ? UTW_OK : UTW_E_SYNTAX);
        if (n == 40) assert_true(utw_let_value(let, 0) == 40);
        if (n != 40)
            assert_non_null(strstr(err.text, "names depend on one another more than 50 deep"));
        utw_let_free(let);
    }
}

static void floating_point_flags_are_left_alone(void **state)
{
    (void)state;
    const char *const row[][2] = {{"t", "5"}};
    utw_let *let = let_of(1, row);
    utw_error err;
    double x;
    assert_ok(utw_let_resolve(let, &err));
    feclearexcept(FE_ALL_EXCEPT);
    assert_int_equal(utw_let_evaluate(let, "1/0", &x, &err), UTW_E_SYNTAX);
    assert_int_equal(fetestexcept(FE_ALL_EXCEPT), 0);
    feraiseexcept(FE_DIVBYZERO);
    assert_ok(utw_let_evaluate(let, "1/3", &x, &err)); /* a flag of before is not ours */
    assert_int_equal(fetestexcept(FE_DIVBYZERO), FE_DIVBYZERO);
    feclearexcept(FE_ALL_EXCEPT);
    utw_let_free(let);
}

static void memory_may_run_out(void **state)
{
    (void)state;
    for (long n = 1; n <= 7; n++) {
        utw_let *let = NULL;
        utw_error err;
        utw_memory_fail_at(n);
        utw_status st = utw_let_create(2, &let, &err);
        if (st == UTW_OK) st = utw_let_define(let, "a", "1+1", 0, &err);
        if (st == UTW_OK) st = utw_let_define(let, "b", NULL, 2, &err);
        if (st == UTW_OK) st = utw_let_set(let, "b=3", &err);
        utw_memory_fail_at(0);
        assert_int_equal(st, n <= 6 ? UTW_E_NOMEM : UTW_OK);
        utw_let_free(let);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(names_are_found_in_any_order),
        balanced_test(expressions_have_their_value),
        balanced_test(wrong_expressions_are_refused),
        balanced_test(faults_name_their_dimension),
        balanced_test(names_must_be_names),
        balanced_test(names_are_set_from_outside),
        balanced_test(a_long_chain_ends),
        balanced_test(floating_point_flags_are_left_alone),
        balanced_test(memory_may_run_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
