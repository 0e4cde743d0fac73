/* SPDX-License-Identifier: GPL-3.0-or-later
 * Files in memory: growing them, giving an SVG its title, saving them. */
#ifndef UTW_DRAW_BYTES_H
#define UTW_DRAW_BYTES_H

#include <stddef.h>

#include "untwist.h"

/** Bytes that grow. Start from {NULL, 0, 0}. */
typedef struct utw_bytes {
    unsigned char *data; /* [n], owned */
    size_t n, capacity;
} utw_bytes;

/** 0, or -1 when memory is out. */
int utw_bytes_add(utw_bytes *bytes, const void *data, size_t n);

/** Put a title element into an SVG (Scalable Vector Graphics 1.1, 5.4). UTW_E_NOMEM. */
utw_status utw_tag_svg(utw_bytes *svg, const char *title, utw_error *err);

/** Write bytes as a file, all or nothing: what could not be finished is removed. UTW_E_FILE. */
utw_status utw_bytes_save(const unsigned char *bytes, size_t n, const char *path, utw_error *err);

#endif
