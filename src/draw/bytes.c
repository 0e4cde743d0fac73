/* SPDX-License-Identifier: GPL-3.0-or-later
 * Files in memory. */
#include "draw/bytes.h"

#include <errno.h>
#include <stdio.h>
#include <string.h>
#include <strings.h>
#include <sys/stat.h>

#include "base/memory.h"
#include "base/status.h"
#include "draw/canvas.h"

int utw_bytes_add(utw_bytes *b, const void *data, size_t n)
{
    void *block = b->data;
    if (utw_grow(&block, &b->capacity, b->n + n, 1) != 0) return -1;
    b->data = block;
    if (n > 0) memcpy(b->data + b->n, data, n);
    b->n += n;
    return 0;
}

/* Put n bytes before position `at`. */
static utw_status insert(utw_bytes *b, size_t at, const void *data, size_t n, utw_error *err)
{
    if (utw_bytes_add(b, data, n) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    memmove(b->data + at + n, b->data + at, b->n - n - at);
    memcpy(b->data + at, data, n);
    return UTW_OK;
}

/* The text with &, < and > escaped, between <title> and </title>. */
static int write_title(utw_bytes *b, const char *title)
{
    int bad = utw_bytes_add(b, "\n<title>", 8);
    for (const char *s = title; *s != '\0'; s++) {
        const char *plain = *s == '&' ? "&amp;" : *s == '<' ? "&lt;" : *s == '>' ? "&gt;" : NULL;
        bad |= plain != NULL ? utw_bytes_add(b, plain, strlen(plain)) : utw_bytes_add(b, s, 1);
    }
    return bad | utw_bytes_add(b, "</title>", 8);
}

utw_status utw_tag_svg(utw_bytes *svg, const char *title, utw_error *err)
{
    static const char start[] = "<svg ";
    utw_bytes text = {NULL, 0, 0};
    utw_status st = UTW_E_INTERNAL;
    size_t at = 0;
    while (at + sizeof start < svg->n && memcmp(svg->data + at, start, sizeof start - 1) != 0) at++;
    while (at < svg->n && svg->data[at] != '>') at++;
    if (at >= svg->n) return utw_fail(err, UTW_E_INTERNAL, "an SVG without its element");
    if (write_title(&text, title) != 0) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    UTW_TRY(insert(svg, at + 1, text.data, text.n, err));
    st = UTW_OK;
done:
    utw_free(text.data);
    return st;
}

utw_status utw_format_of(const char *path, utw_picture_format *format, utw_error *err)
{
    static const struct {
        const char *ending;
        utw_picture_format format;
    } list[] = {{".svg", UTW_SVG}, {".pdf", UTW_PDF}, {".png", UTW_PNG}};
    const size_t n = strlen(path);
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (n > 4 && strcasecmp(path + n - 4, list[i].ending) == 0) {
            *format = list[i].format;
            return UTW_OK;
        }
    return utw_fail(err, UTW_E_ARGUMENT,
                    "%s: the ending says what to write; it must be .svg, .pdf or .png", path);
}

utw_status utw_bytes_save(const unsigned char *bytes, size_t n, const char *path, utw_error *err)
{
    FILE *file = fopen(path, "wb");
    if (file == NULL)
        return utw_fail(err, UTW_E_FILE, "%s: cannot be written: %s", path, strerror(errno));
    errno = 0;
    const int bad = fwrite(bytes, 1, n, file) != n;
    const int reason = errno;
    if ((fclose(file) != 0) | bad) {
        const int why = bad ? reason : errno;
        struct stat what;
        if (stat(path, &what) == 0 && S_ISREG(what.st_mode)) remove(path);
        return utw_fail(err, UTW_E_FILE, "%s: not written in full: %s", path, strerror(why));
    }
    return UTW_OK;
}
