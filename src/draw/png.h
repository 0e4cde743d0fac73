/* SPDX-License-Identifier: GPL-3.0-or-later
 * Images as PNG files. The only file that names zlib. */
#ifndef UTW_DRAW_PNG_H
#define UTW_DRAW_PNG_H

#include "draw/bytes.h"

/** Write an image [ny][nx] of 0x00RRGGBB as a PNG that knows its resolution (Portable Network
 * Graphics Specification, 2nd ed., ISO/IEC 15948:2003). Rows are compressed without prediction and
 * with few search steps: drawings are flat areas, which that packs best and fastest. [out] bytes
 * are added to *png. UTW_E_NOMEM, UTW_E_INTERNAL. */
utw_status utw_png_write(const unsigned *pixel, int nx, int ny, double dpi, utw_bytes *png,
                         utw_error *err);

#endif
