/* SPDX-License-Identifier: GPL-3.0-or-later
 * A file, or standard input, into memory. */
#include <errno.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "outline/read.h"

static const size_t LARGEST = (size_t)64 << 20;

utw_status utw_read_file(const char *path, char **text, size_t *n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int standard = strcmp(path, "-") == 0;
    char *content = NULL;
    size_t length = 0, capacity = 0;
    errno = 0;
    FILE *file = standard ? stdin : fopen(path, "rb");
    if (file == NULL) return utw_fail(err, UTW_E_FILE, "cannot be opened: %s", strerror(errno));
    for (;;) {
        if (utw_grow((void **)&content, &capacity, length + 65536, 1) != 0) {
            st = utw_fail(err, UTW_E_NOMEM, "out of memory (file of more than %zu bytes)", length);
            goto done;
        }
        errno = 0;
        const size_t got = fread(content + length, 1, capacity - length, file);
        length += got;
        if (length > LARGEST) {
            st = utw_fail(err, UTW_E_FILE, "is larger than 64 MiB; this is not a section file");
            goto done;
        }
        if (got == 0) break;
    }
    if (ferror(file)) {
        st = utw_fail(err, UTW_E_FILE, "cannot be read: %s", strerror(errno));
        goto done;
    }
    *text = content;
    *n = length;
    content = NULL;
    st = UTW_OK;
done:
    if (!standard) fclose(file);
    utw_free(content);
    return st;
}
