/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "field/system.h"
#include "support/support.h"

/* Blocks of 2, 0, 1 and 1 unknowns; two elements join 0-1-2 and 2-3. */
static const int size[4] = {2, 0, 1, 1}, first[3] = {0, 3, 5}, item[5] = {0, 1, 2, 2, 3};

static utw_system *made(void)
{
    utw_error err;
    utw_system *s = NULL;
    assert_ok(utw_system_create(4, size, 2, first, item, &s, &err));
    return s;
}

static void element_matrices_are_added_and_solved(void **state)
{
    (void)state;
    utw_error err;
    utw_system *s = made();
    assert_int_equal(utw_system_size(s), 4);
    int seen[4] = {0}; /* every unknown belongs to one block */
    for (int b = 0; b < 4; b++)
        for (int i = 0; i < size[b]; i++) seen[utw_system_offset(s, b) + i]++;
    for (int i = 0; i < 4; i++) assert_int_equal(seen[i], 1);
    /* rows: block 2, block 0 (two); the leading dimension is greater than the matrix */
    const double A[3 * 4] = {5, 1, 2, 99, 1, 4, 1, 99, 2, 1, 6, 99};
    const double B[2 * 2] = {3, -1, -1, 2};
    utw_system_add(s, 2, (int[]){2, 0}, (int[]){0, 1, 3}, A, 4);
    utw_system_add(s, 2, (int[]){2, 3}, (int[]){0, 1, 2}, B, 2);
    assert_ok(utw_system_factorise(s, &err));
    /* the sum, unknowns a a' (block 0), c (2), d (3):
       [4 1 1 0; 1 6 2 0; 1 2 8 -1; 0 0 -1 2] */
    const double full[4][4] = {{4, 1, 1, 0}, {1, 6, 2, 0}, {1, 2, 8, -1}, {0, 0, -1, 2}};
    const double x[2][4] = {{1, -2, 3, 0.5}, {0.25, 7, -1, 2}};
    const int at[4] = {utw_system_offset(s, 0), utw_system_offset(s, 0) + 1,
                       utw_system_offset(s, 2), utw_system_offset(s, 3)};
    double b[8] = {0};
    for (int r = 0; r < 2; r++)
        for (int i = 0; i < 4; i++)
            for (int j = 0; j < 4; j++) b[4 * r + at[i]] += full[i][j] * x[r][j];
    assert_ok(utw_system_solve(s, 2, b, &err));
    for (int r = 0; r < 2; r++)
        for (int i = 0; i < 4; i++) assert_close(b[4 * r + at[i]], x[r][i], 1e-14);
    utw_system_free(s);
}

/* A known block is dropped; a block that stands twice gets all four entries. */
static void known_and_repeated_blocks(void **state)
{
    (void)state;
    utw_error err;
    utw_system *s = NULL;
    const int one[1] = {1}, ends[2] = {0, 1}, zero[1] = {0};
    assert_ok(utw_system_create(1, one, 1, ends, zero, &s, &err));
    const double A[9] = {2, 0.5, 7, 0.5, 3, 8, 7, 8, 9};
    utw_system_add(s, 3, (int[]){0, 0, -1}, (int[]){0, 1, 2, 3}, A, 3);
    assert_ok(utw_system_factorise(s, &err));
    double b[1] = {12};
    assert_ok(utw_system_solve(s, 1, b, &err));
    assert_close(b[0], 12 / (2 + 0.5 + 0.5 + 3), 1e-15);
    double analyse, factorise, solve;
    utw_system_seconds(s, &analyse, &factorise, &solve);
    assert_true(analyse >= 0 && factorise >= 0 && solve >= 0);
    utw_system_free(s);
}

static void what_is_not_positive_definite_is_told(void **state)
{
    (void)state;
    static const double entry[] = {0, -1};
    for (int i = 0; i < 2; i++) {
        utw_error err;
        utw_system *s = NULL;
        const int two[1] = {2}, ends[2] = {0, 1}, zero[1] = {0};
        assert_ok(utw_system_create(1, two, 1, ends, zero, &s, &err));
        const double A[4] = {1, 0, 0, entry[i]};
        utw_system_add(s, 1, (int[]){0}, (int[]){0, 2}, A, 2);
        assert_int_equal(utw_system_factorise(s, &err), UTW_E_SINGULAR);
        assert_true(strlen(err.text) > 10);
        utw_system_free(s);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(element_matrices_are_added_and_solved),
        balanced_test(known_and_repeated_blocks),
        balanced_test(what_is_not_positive_definite_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
