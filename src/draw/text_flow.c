/* SPDX-License-Identifier: GPL-3.0-or-later
 * Breaking text into lines, and notes into columns. */
#include "draw/text_flow.h"

#include <math.h>
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

#define LINE       1.35 /* distance of lines over the size of the font */
#define ASCENT     1.0  /* of the first base line below the top */
#define COLUMN_GAP 2.0
#define SIGN_ROOM  1.9 /* before a note with a sign */

enum { LINE_BYTES = 400 };

/* Bytes of the longest piece of text that fits and ends before a blank or at the end; when the
 * first word alone is too wide, as many whole characters of it as fit, one at least. */
static size_t fitting(utw_canvas *c, const char *text, const utw_type *type, double width)
{
    char piece[LINE_BYTES];
    size_t best = 0, forced = 0, n = 0;
    while (text[n] != '\0' && n + 8 < sizeof piece) {
        do n++;
        while (((unsigned char)text[n] & 0xC0) == 0x80); /* whole UTF-8 characters */
        if (text[n] != '\0' && text[n] != ' ' && best > 0) continue;
        memcpy(piece, text, n);
        piece[n] = '\0';
        if (forced > 0 && utw_canvas_measure(c, piece, type).width > width) break;
        forced = n;
        if (text[n] == ' ' || text[n] == '\0') best = n;
    }
    return best > 0 ? best : forced;
}

double utw_flow_text(utw_canvas *c, double x, double y, double width, const char *text,
                     const utw_type *type, int draw)
{
    double base = y + ASCENT * type->size;
    int any = 0;
    while (*text == ' ') text++;
    while (*text != '\0') {
        char piece[LINE_BYTES];
        const size_t n = fitting(c, text, type, width);
        memcpy(piece, text, n);
        piece[n] = '\0';
        if (any) base += LINE * type->size;
        any = 1;
        if (draw) utw_canvas_text(c, x, base, 0, 0, piece, type);
        for (text += n; *text == ' ';) text++;
    }
    return any ? base + (LINE - ASCENT) * type->size : y;
}

void utw_notes_add(utw_notes *notes, int sign, const char *format, ...)
{
    va_list list;
    if (notes->n == UTW_NOTES_MAX) return;
    utw_note *note = &notes->note[notes->n++];
    note->sign = sign;
    va_start(list, format);
    vsnprintf(note->text, sizeof note->text, format, list);
    va_end(list);
}

double utw_flow_notes(utw_canvas *c, double x, double y, double width, const utw_notes *notes,
                      const utw_type *type, int draw,
                      void (*sign_at)(utw_canvas *, int, double, double, double))
{
    const double f = type->size, gap = COLUMN_GAP * f;
    double widest = 0, indent = 0;
    if (notes->n == 0) return y;
    for (int i = 0; i < notes->n; i++)
        if (notes->note[i].sign != 0) indent = SIGN_ROOM * f;
    for (int i = 0; i < notes->n; i++)
        widest = fmax(widest, indent + utw_canvas_measure(c, notes->note[i].text, type).width);
    int columns = (int)floor((width + gap) / (widest + gap));
    columns = columns < 1 ? 1 : columns > notes->n ? notes->n : columns;
    const int rows = (notes->n + columns - 1) / columns;
    columns = (notes->n + rows - 1) / rows;
    const double pitch = columns > 1 ? fmin(widest + gap, (width + gap) / columns) : width;
    double bottom = y;
    for (int k = 0; k < columns; k++) {
        double at = y;
        for (int i = k * rows; i < (k + 1) * rows && i < notes->n; i++) {
            const utw_note *note = &notes->note[i];
            if (draw && note->sign != 0 && sign_at != NULL)
                sign_at(c, note->sign, x + k * pitch + 0.6 * f, at + 0.63 * f, f);
            at = utw_flow_text(c, x + k * pitch + indent, at,
                               (columns > 1 ? pitch - gap : width) - indent + 1e-6, note->text,
                               type, draw);
        }
        bottom = fmax(bottom, at);
    }
    return bottom;
}
