/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/read.h"

#include <unistd.h>

#include "base/memory.h"
#include "support/support.h"

static char path[] = "/tmp/untwist-read-XXXXXX";

static int make_file(void **state)
{
    (void)state;
    const int file = mkstemp(path);
    return file < 0 ? -1 : close(file);
}

static int remove_file(void **state)
{
    (void)state;
    return remove(path);
}

static void write_file(size_t n)
{
    FILE *file = fopen(path, "wb");
    assert_non_null(file);
    for (size_t i = 0; i < n; i++) fputc((int)('a' + i % 26), file);
    assert_int_equal(fclose(file), 0);
}

static void content_is_read_whole(void **state)
{
    (void)state;
    const size_t size[] = {0, 1, 65535, 65536, 65537, 300000};
    for (int k = 0; k < 6; k++) {
        char *text = NULL;
        size_t n = 99;
        utw_error err;
        write_file(size[k]);
        assert_ok(utw_read_file(path, &text, &n, &err));
        assert_int_equal(n, size[k]);
        for (size_t i = 0; i < n; i++)
            if (text[i] != (char)('a' + i % 26)) fail();
        utw_free(text);
    }
}

static void standard_input_is_a_dash(void **state)
{
    (void)state;
    char *text = NULL;
    size_t n = 0;
    utw_error err;
    write_file(52);
    assert_non_null(freopen(path, "rb", stdin));
    assert_ok(utw_read_file("-", &text, &n, &err));
    assert_int_equal(n, 52);
    utw_free(text);
}

static void what_cannot_be_read_is_named(void **state)
{
    (void)state;
    char *text = NULL;
    size_t n = 0;
    utw_error err;
    utw_outline *outline = NULL;
    assert_int_equal(utw_outline_read("/nowhere/section.json", &outline, &err), UTW_E_FILE);
    assert_string_equal(err.text,
                        "/nowhere/section.json: cannot be opened: No such file or directory");
    assert_int_equal(utw_outline_read("/tmp", &outline, &err), UTW_E_FILE);
    assert_string_equal(err.text, "/tmp: cannot be read: Is a directory");
    assert_int_equal(truncate(path, (64 << 20) + 1), 0);
    assert_int_equal(utw_outline_read(path, &outline, &err), UTW_E_FILE);
    assert_non_null(strstr(err.text, ": is larger than 64 MiB; this is not a section file"));
    assert_int_equal(utw_read_file("/dev/zero", &text, &n, &err),
                     UTW_E_FILE); /* no end: does not hang */
    assert_null(text);
}

static void memory_may_run_out(void **state)
{
    (void)state;
    char *text = NULL;
    size_t n = 0;
    utw_error err;
    write_file(70000);
    for (long k = 1; k <= 2; k++) {
        utw_memory_fail_at(k);
        assert_int_equal(utw_read_file(path, &text, &n, &err), UTW_E_NOMEM);
        utw_memory_fail_at(0);
        assert_null(text);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(content_is_read_whole),
        balanced_test(standard_input_is_a_dash),
        balanced_test(what_cannot_be_read_is_named),
        balanced_test(memory_may_run_out),
    };
    return cmocka_run_group_tests(tests, make_file, remove_file);
}
