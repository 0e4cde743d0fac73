/* SPDX-License-Identifier: GPL-3.0-or-later
 * What is drawn comes out as it was drawn: pixels, texts, files that other programs accept. */
#include "draw/canvas.h"

#include <unistd.h>

#include "base/memory.h"
#include "draw/bytes.h"
#include "support/support.h"

static utw_canvas *blank(void)
{
    utw_error err;
    utw_canvas *c = NULL;
    assert_ok(utw_canvas_create(&c, &err));
    utw_canvas_size(c, 40, 30);
    return c;
}

/* A page with everything on it. */
static utw_canvas *full(void)
{
    utw_canvas *c = blank();
    const utw_colour blue = {0, 0, 1}, black = {0, 0, 0};
    const utw_pen pen = {.width = 0.5, .colour = black, .dash = {1, 0.5, 0.2, 0.5}};
    const utw_type type = {.size = 3, .colour = black, .markup = 1};
    const unsigned image[4] = {0xFFFF0000, 0xFF00FF00, 0xFF0000FF, 0x00000000};
    utw_canvas_rectangle(c, (utw_box){2, 3, 12, 8});
    utw_canvas_fill(c, blue, 1);
    utw_canvas_move(c, 2, 20);
    utw_canvas_line(c, 20, 20);
    utw_canvas_cubic(c, 25, 20, 25, 25, 20, 25);
    utw_canvas_stroke(c, &pen);
    utw_canvas_circle(c, 30, 20, 4);
    utw_canvas_clip(c);
    utw_canvas_rectangle(c, (utw_box){25, 18, 40, 30});
    utw_canvas_fill(c, blue, 0.5);
    utw_canvas_unclip(c);
    utw_canvas_image(c, (utw_box){14, 3, 18, 7}, 2, 2, image);
    utw_canvas_text(c, 2, 14, 0, 0, "I_{w} < & >", &type);
    return c;
}

/* The box of the pixels that are darker than half. */
static int dark_box(const utw_canvas *c, double dpi, double box[4])
{
    utw_error err;
    unsigned *rgb = NULL;
    int nx, ny, any = 0;
    assert_ok(utw_canvas_pixels(c, dpi, 1, &rgb, &nx, &ny, &err));
    box[0] = box[1] = 1e9;
    box[2] = box[3] = -1e9;
    for (int y = 0; y < ny; y++)
        for (int x = 0; x < nx; x++) {
            if ((rgb[y * nx + x] >> 8 & 255) > 127) continue;
            any = 1;
            box[0] = fmin(box[0], x * 25.4 / dpi);
            box[1] = fmin(box[1], y * 25.4 / dpi);
            box[2] = fmax(box[2], (x + 1) * 25.4 / dpi);
            box[3] = fmax(box[3], (y + 1) * 25.4 / dpi);
        }
    utw_free(rgb);
    return any;
}

static void figures_lie_where_they_were_put(void **state)
{
    (void)state;
    double box[4];
    utw_canvas *c = blank();
    assert_int_equal(dark_box(c, 200, box), 0);
    utw_canvas_rectangle(c, (utw_box){2.5, 3.25, 12.75, 8.5});
    utw_canvas_fill(c, (utw_colour){0, 0, 0}, 1);
    assert_int_equal(dark_box(c, 254, box), 1);
    assert_true(fabs(box[0] - 2.5) < 0.11 && fabs(box[1] - 3.25) < 0.11 &&
                fabs(box[2] - 12.75) < 0.11 && fabs(box[3] - 8.5) < 0.11);
    utw_canvas_free(c);
}

/* The box that is told holds the ink of the text, and not much more: with every anchor, turned or
 * not, with markup and with letters that hang below the line. */
static void text_lies_in_its_box(void **state)
{
    (void)state;
    static const char *const texts[] = {"Example", "pqy_{xy}g", "\xCF\x89 = 12.5 mm^{2}",
                                        "\xE2\x88\x92"
                                        "468.8",
                                        "A\xC2\xB7"
                                        "10\xE2\x81\xB7"};
    for (size_t i = 0; i < sizeof texts / sizeof *texts; i++)
        for (int upright = 0; upright <= 1; upright++)
            for (int anchor = 0; anchor < 9; anchor++) {
                double ink[4];
                utw_canvas *c = blank();
                const utw_type type = {.size = 1.9385, .markup = 1, .upright = upright};
                const utw_box told = utw_canvas_text_box(c, 20, 15, 0.5 * (anchor % 3),
                                                         0.5 * (anchor / 3), texts[i], &type);
                const utw_box box = utw_canvas_text(c, 20, 15, 0.5 * (anchor % 3),
                                                    0.5 * (anchor / 3), texts[i], &type);
                assert_memory_equal(&told, &box, sizeof box);
                assert_int_equal(dark_box(c, 600, ink), 1);
                const double slack = 0.09;
                assert_true(ink[0] > box.x0 - slack && ink[1] > box.y0 - slack &&
                            ink[2] < box.x1 + slack && ink[3] < box.y1 + slack);
                assert_true(ink[2] - ink[0] > 0.9 * (box.x1 - box.x0) - 0.5);
                assert_true(ink[3] - ink[1] > 0.9 * (box.y1 - box.y0) - 0.5);
                utw_canvas_free(c);
            }
}

static void texts_are_reported(void **state)
{
    (void)state;
    int n;
    utw_canvas *c = full();
    const utw_placed_text *t = utw_canvas_placed(c, &n);
    assert_int_equal(n, 1);
    assert_string_equal(t[0].text, "I_{w} < & >");
    assert_true(t[0].box.x0 > 1.9 && t[0].box.x1 < 25);
    utw_canvas_free(c);
}

/* Write the bytes beside others' and let a program look at them. */
static void accepted_by(const unsigned char *bytes, size_t n, const char *ending,
                        const char *command)
{
    utw_error err;
    char path[64], line[800], *output = NULL;
    snprintf(path, sizeof path, "/tmp/untwist-test-%ld.%s", (long)getpid(), ending);
    assert_ok(utw_bytes_save(bytes, n, path, &err));
    snprintf(line, sizeof line, "f=%s; %s", path, command);
    const int status = utw_run(line, &output);
    if (status != 0) print_error("%s: %s\n", line, output);
    remove(path);
    free(output);
    assert_int_equal(status, 0);
}

static void files_are_valid(void **state)
{
    (void)state;
    utw_error err;
    unsigned char *bytes = NULL;
    size_t n;
    utw_canvas *c = full();
    assert_ok(utw_canvas_bytes(c, UTW_SVG, "a < b & c", 150, &bytes, &n, &err));
    assert_non_null(strstr((char *)bytes, "<title>a &lt; b &amp; c</title>"));
    assert_non_null(strstr((char *)bytes, "width=\"40mm\" height=\"30mm\""));
    accepted_by(bytes, n, "svg", "xmllint --noout $f 2>&1");
    utw_free(bytes);
    assert_ok(utw_canvas_bytes(c, UTW_PDF, "a < b & c", 150, &bytes, &n, &err));
    accepted_by(bytes, n, "pdf", "pdfinfo $f 2>&1 | grep -q 'Page size: *113.386 x 85.0394'");
    accepted_by(bytes, n, "pdf", "pdfinfo $f 2>&1 | grep -q 'Title: *a < b & c'");
    accepted_by(bytes, n, "pdf", "pdftoppm -r 100 $f >/dev/null 2>&1");
    accepted_by(bytes, n, "pdf", "pdftotext $f - | grep -q 'I *w *< & >'");
    utw_free(bytes);
    utw_canvas_free(c);
}

static unsigned long number_at(const unsigned char *at)
{
    return (unsigned long)at[0] << 24 | (unsigned long)at[1] << 16 | (unsigned long)at[2] << 8 |
           at[3];
}

/* Signature, size, and pHYs in dots per metre (ISO/IEC 15948:2003). python3's zlib unpacks it. */
static void images_know_their_size(void **state)
{
    (void)state;
    utw_error err;
    unsigned char *bytes = NULL;
    size_t n;
    utw_canvas *c = full();
    assert_ok(utw_canvas_bytes(c, UTW_PNG, NULL, 254, &bytes, &n, &err));
    assert_memory_equal(bytes, "\x89PNG\r\n\x1a\n", 8);
    assert_int_equal(number_at(bytes + 16), 400);
    assert_int_equal(number_at(bytes + 20), 300);
    assert_memory_equal(bytes + 37, "pHYs", 4);
    assert_int_equal(number_at(bytes + 41), 10000);
    accepted_by(
        bytes, n, "png",
        "python3 -c 'import zlib,sys; d=open(sys.argv[1],\"rb\").read(); i=d.index(b\"IDAT\"); "
        "n=int.from_bytes(d[i-4:i],\"big\"); r=zlib.decompress(d[i+4:i+4+n]); "
        "assert zlib.crc32(d[i:i+4+n])==int.from_bytes(d[i+4+n:i+8+n],\"big\"); "
        "assert len(r)==300*1201; k=50*1201+1+3*50; assert r[k:k+3]==b\"\\0\\0\\xff\"' $f 2>&1");
    utw_free(bytes);
    utw_canvas_free(c);
}

static void impossible_pages_are_refused(void **state)
{
    (void)state;
    utw_error err;
    unsigned char *bytes = NULL;
    size_t n;
    utw_canvas *c = blank();
    utw_canvas_size(c, 1e6, 30);
    assert_int_equal(utw_canvas_bytes(c, UTW_PNG, NULL, 150, &bytes, &n, &err), UTW_E_ARGUMENT);
    assert_non_null(strstr(err.text, "too large for an image"));
    utw_canvas_free(c);
}

static void the_ending_says_the_format(void **state)
{
    (void)state;
    utw_error err;
    utw_picture_format f;
    assert_ok(utw_format_of("a/b.svg", &f, &err));
    assert_int_equal(f, UTW_SVG);
    assert_ok(utw_format_of("x.PDF", &f, &err));
    assert_int_equal(f, UTW_PDF);
    assert_ok(utw_format_of("x.y.png", &f, &err));
    assert_int_equal(f, UTW_PNG);
    static const char *const bad[] = {"picture", "picture.jpg", ".svg", "", "a.svg/b"};
    for (size_t i = 0; i < sizeof bad / sizeof *bad; i++)
        assert_int_equal(utw_format_of(bad[i], &f, &err), UTW_E_ARGUMENT);
}

static void paths_that_cannot_be_written_are_told(void **state)
{
    (void)state;
    utw_error err;
    const unsigned char bytes[3] = {1, 2, 3};
    assert_int_equal(utw_bytes_save(bytes, 3, "/no/such/folder/a.svg", &err), UTW_E_FILE);
    assert_string_equal(err.text,
                        "/no/such/folder/a.svg: cannot be written: No such file or directory");
    assert_int_equal(utw_bytes_save(bytes, 3, "/tmp", &err), UTW_E_FILE);
    if (access("/dev/full", W_OK) == 0) {
        assert_int_equal(utw_bytes_save(bytes, 3, "/dev/full", &err), UTW_E_FILE);
        assert_string_equal(err.text, "/dev/full: not written in full: No space left on device");
        assert_int_equal(access("/dev/full", F_OK), 0);
    }
}

/* Every allocation fails once: the canvas tells, or the writer does. */
static void no_memory_is_told(void **state)
{
    (void)state;
    for (int format = UTW_SVG; format <= UTW_PNG; format++) {
        utw_status st = UTW_E_NOMEM;
        for (long k = 1; st == UTW_E_NOMEM; k++) {
            utw_error err;
            utw_canvas *c = NULL;
            unsigned char *bytes = NULL;
            size_t n = 0;
            const utw_type type = {.size = 3, .markup = 1};
            const unsigned image[1] = {0xFF112233};
            utw_memory_fail_at(k);
            st = utw_canvas_create(&c, &err);
            if (st == UTW_OK) {
                utw_canvas_size(c, 20, 10);
                utw_canvas_rectangle(c, (utw_box){2, 3, 12, 8});
                utw_canvas_fill(c, (utw_colour){0, 1, 0}, 1);
                utw_canvas_image(c, (utw_box){2, 3, 12, 8}, 1, 1, image);
                utw_canvas_text(c, 2, 8, 0, 0, "text", &type);
                st = utw_canvas_bytes(c, (utw_picture_format)format, "t", 50, &bytes, &n, &err);
            }
            utw_memory_fail_at(0);
            utw_canvas_free(c);
            utw_free(bytes);
            assert_true(k < 200);
        }
        assert_int_equal(st, UTW_OK);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(figures_lie_where_they_were_put),
        balanced_test(text_lies_in_its_box),
        balanced_test(texts_are_reported),
        balanced_test(files_are_valid),
        balanced_test(images_know_their_size),
        balanced_test(impossible_pages_are_refused),
        balanced_test(the_ending_says_the_format),
        balanced_test(paths_that_cannot_be_written_are_told),
        balanced_test(no_memory_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
