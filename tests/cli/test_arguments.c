/* SPDX-License-Identifier: GPL-3.0-or-later
 * Reading arguments for a command made up here; wrong ones are told in tests/cli/test_cli_*.c. */
#include "cli/arguments.h"

#include "base/memory.h"
#include "cli/message.h"
#include "support/support.h"

static const cli_option options[] = {
    {"flag", NULL, "", CLI_FLAG, 0, 0, 0},         {"text", "TEXT", "", CLI_TEXT, 0, 0, 0},
    {"number", "X", "", CLI_NUMBER, -2.5, 7.5, 0}, {"whole", "N", "", CLI_INTEGER, 1, 12, 0},
    {"each", "TEXT", "", CLI_TEXT, 0, 0, 1},
};

static const cli_command command = {"try", "A [B]", "", "", 1, 2, 5, options, NULL};

/* Words end at NULL. */
static int read_words(cli_call *call, int *help, char **word)
{
    int n = 0;
    while (word[n] != NULL) n++;
    return cli_read_arguments(&command, n, word, call, help);
}

#define READ(...) read_words(&call, &help, (char *[]){__VA_ARGS__, NULL})

static void options_and_operands_come_in_any_order(void **state)
{
    (void)state;
    cli_call call;
    int help;
    assert_int_equal(READ("a", "--flag", "--text", "t", "b", "--number=-2.5", "--whole", "12"),
                     CLI_DONE);
    assert_int_equal(help, 0);
    assert_int_equal(call.n_operand, 2);
    assert_string_equal(call.operand[0], "a");
    assert_string_equal(call.operand[1], "b");
    assert_true(cli_flag(&call, "flag") && !cli_flag(&call, "each"));
    assert_string_equal(cli_text(&call, "text"), "t");
    assert_null(cli_text(&call, "each"));
    assert_true(cli_number(&call, "number", 3) == -2.5);
    assert_true(cli_number(&call, "whole", 3) == 12);
    cli_clear_call(&call);
    assert_int_equal(READ("--whole=1", "a"), CLI_DONE);
    assert_true(cli_number(&call, "number", 3) == 3);
    cli_clear_call(&call);
}

static void values_may_look_like_anything(void **state)
{
    (void)state;
    cli_call call;
    int help;
    assert_int_equal(READ("-", "--text=--flag", "--number", "-1e-1", "--", "--whole"), CLI_DONE);
    assert_string_equal(call.operand[0], "-");       /* standard input */
    assert_string_equal(call.operand[1], "--whole"); /* behind "--" */
    assert_string_equal(cli_text(&call, "text"), "--flag");
    assert_true(cli_number(&call, "number", 3) == -0.1 && !cli_flag(&call, "flag"));
    cli_clear_call(&call);
    assert_int_equal(READ("a", "--text", "x=y=z"), CLI_DONE);
    assert_string_equal(cli_text(&call, "text"), "x=y=z");
    cli_clear_call(&call);
}

static void what_repeats_is_kept_in_order(void **state)
{
    (void)state;
    cli_call call;
    int help;
    assert_int_equal(READ("--each", "1", "a", "--each=2", "--flag", "--each", "1"), CLI_DONE);
    assert_string_equal(cli_option_given(&call, "each", 0)->text, "1");
    assert_string_equal(cli_option_given(&call, "each", 1)->text, "2");
    assert_string_equal(cli_option_given(&call, "each", 2)->text, "1");
    assert_null(cli_option_given(&call, "each", 3));
    cli_clear_call(&call);
}

static void help_comes_before_all_checks(void **state)
{
    (void)state;
    cli_call call;
    int help;
    assert_int_equal(READ("--nonsense", "--whole", "99", "--help"), CLI_DONE);
    assert_int_equal(help, 1);
    cli_clear_call(&call);
    assert_int_equal(READ("-h"), CLI_DONE);
    assert_int_equal(help, 1);
    cli_clear_call(&call);
    assert_int_equal(READ("--", "--help"), CLI_DONE); /* an operand */
    assert_int_equal(help, 0);
    cli_clear_call(&call);
}

static void too_little_memory_is_no_result(void **state)
{
    (void)state;
    cli_call call;
    int help;
    for (int n = 1; n <= 2; n++) {
        utw_memory_fail_at(n);
        const int status = READ("a");
        utw_memory_fail_at(0);
        assert_int_equal(status, CLI_NO_RESULT);
        cli_clear_call(&call);
    }
}

/* Every status of the library has its exit status (design of the exit statuses: docs/untwist.1). */
static void statuses_become_exit_statuses(void **state)
{
    (void)state;
    assert_int_equal(cli_exit_status(UTW_OK), 0);
    assert_int_equal(cli_exit_status(UTW_E_ARGUMENT), 2);
    static const utw_status input[] = {UTW_E_FILE, UTW_E_SYNTAX, UTW_E_OUTLINE, UTW_E_MATERIAL,
                                       UTW_E_LOAD};
    static const utw_status none[] = {UTW_E_NOMEM,        UTW_E_MESH,      UTW_E_SINGULAR,
                                      UTW_E_NO_THIN_WALL, UTW_E_UNBOUNDED, UTW_E_INTERNAL,
                                      (utw_status)9999};
    for (size_t i = 0; i < sizeof input / sizeof *input; i++)
        assert_int_equal(cli_exit_status(input[i]), 3);
    for (size_t i = 0; i < sizeof none / sizeof *none; i++)
        assert_int_equal(cli_exit_status(none[i]), 4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(options_and_operands_come_in_any_order),
        balanced_test(values_may_look_like_anything),
        balanced_test(what_repeats_is_kept_in_order),
        balanced_test(help_comes_before_all_checks),
        balanced_test(too_little_memory_is_no_result),
        balanced_test(statuses_become_exit_statuses),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
