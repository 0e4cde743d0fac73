/* SPDX-License-Identifier: GPL-3.0-or-later
 * A PNG of three chunks: header, resolution, image data. */
#include "draw/png.h"

#include <math.h>
#include <string.h>
#include <zlib.h>

#include "base/memory.h"
#include "base/status.h"

/* Compression level: higher ones take three times as long for a tenth of the size. */
enum { LEVEL = 5, CHANNELS = 3 };

static void put32(unsigned char *at, unsigned long value)
{
    for (int i = 0; i < 4; i++) at[i] = (unsigned char)(value >> (24 - 8 * i));
}

static utw_status add_chunk(utw_bytes *png, const char type[5], const unsigned char *data, size_t n,
                            utw_error *err)
{
    unsigned char head[8], tail[4];
    uLong crc = crc32(crc32(0, NULL, 0), (const Bytef *)type, 4);
    if (n > 0) crc = crc32(crc, data, (uInt)n);
    put32(head, (unsigned long)n);
    memcpy(head + 4, type, 4);
    put32(tail, crc);
    if (utw_bytes_add(png, head, 8) != 0 || utw_bytes_add(png, data, n) != 0 ||
        utw_bytes_add(png, tail, 4) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    return UTW_OK;
}

/* zlib's working memory comes through the library's door. */
static voidpf zlib_alloc(voidpf opaque, uInt items, uInt size)
{
    (void)opaque;
    return utw_alloc(items, size);
}

static void zlib_free(voidpf opaque, voidpf block)
{
    (void)opaque;
    utw_free(block);
}

/* Compress rows, each led by filter type 0. out has room for the bound of all of them. */
static int compress_rows(z_stream *z, const unsigned *pixel, int nx, int ny, unsigned char *row,
                         unsigned char *out, size_t room)
{
    z->next_out = out;
    z->avail_out = (uInt)room;
    row[0] = 0;
    for (int y = 0; y < ny; y++) {
        for (int x = 0; x < nx; x++) {
            const unsigned p = pixel[(size_t)y * (size_t)nx + (size_t)x];
            unsigned char *to = row + 1 + CHANNELS * x;
            to[0] = (unsigned char)(p >> 16);
            to[1] = (unsigned char)(p >> 8);
            to[2] = (unsigned char)p;
        }
        z->next_in = row;
        z->avail_in = 1 + CHANNELS * (uInt)nx;
        const int result = deflate(z, y == ny - 1 ? Z_FINISH : Z_NO_FLUSH);
        if (result != Z_OK && result != Z_STREAM_END) return result;
    }
    return Z_OK;
}

static utw_status add_image(const unsigned *pixel, int nx, int ny, utw_bytes *png, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *row = NULL, *out = NULL;
    const size_t length = 1 + CHANNELS * (size_t)nx;
    z_stream z;
    memset(&z, 0, sizeof z);
    z.zalloc = zlib_alloc;
    z.zfree = zlib_free;
    if (deflateInit(&z, LEVEL) != Z_OK)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    const size_t room = deflateBound(&z, (uLong)(length * (size_t)ny));
    UTW_TRY_ALLOC(row = utw_alloc(length, 1));
    UTW_TRY_ALLOC(out = utw_alloc(room, 1));
    const int result = compress_rows(&z, pixel, nx, ny, row, out, room);
    if (result != Z_OK) {
        st = utw_fail(err, UTW_E_INTERNAL, "zlib: error %d", result);
        goto done;
    }
    UTW_TRY(add_chunk(png, "IDAT", out, room - z.avail_out, err));
    st = UTW_OK;
done:
    deflateEnd(&z);
    utw_free(row);
    utw_free(out);
    return st;
}

utw_status utw_png_write(const unsigned *pixel, int nx, int ny, double dpi, utw_bytes *png,
                         utw_error *err)
{
    static const unsigned char signature[8] = {0x89, 'P', 'N', 'G', '\r', '\n', 0x1A, '\n'};
    utw_status st = UTW_E_INTERNAL;
    unsigned char header[13] = {0}, resolution[9] = {0};
    const unsigned long per_metre = (unsigned long)lround(dpi / 0.0254);
    put32(header, (unsigned long)nx);
    put32(header + 4, (unsigned long)ny);
    header[8] = 8; /* bits */
    header[9] = 2; /* red, green, blue */
    put32(resolution, per_metre);
    put32(resolution + 4, per_metre);
    resolution[8] = 1; /* per metre */
    if (utw_bytes_add(png, signature, sizeof signature) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    UTW_TRY(add_chunk(png, "IHDR", header, sizeof header, err));
    UTW_TRY(add_chunk(png, "pHYs", resolution, sizeof resolution, err));
    UTW_TRY(add_image(pixel, nx, ny, png, err));
    UTW_TRY(add_chunk(png, "IEND", NULL, 0, err));
    st = UTW_OK;
done:
    return st;
}
