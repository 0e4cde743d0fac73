/* SPDX-License-Identifier: GPL-3.0-or-later
 * Text of several lines, and notes set in columns. */
#ifndef UTW_DRAW_TEXT_FLOW_H
#define UTW_DRAW_TEXT_FLOW_H

#include "draw/canvas.h"

/** Set text in lines no wider than `width`, broken at blanks, or anywhere when a word is wider. (x,
 * y) is the top left corner; lines are 1.35 times the size of the font apart. Returns where the
 * text ends below. With draw = 0 nothing is set. */
double utw_flow_text(utw_canvas *canvas, double x, double y, double width, const char *text,
                     const utw_type *type, int draw);

/** A sign that stands before a note, as it stands in the drawing (marks.h); 0: none. */
typedef struct utw_note {
    int sign;
    char text[240];
} utw_note;

enum { UTW_NOTES_MAX = 24 };

/** Notes of a picture, in the order they are read. Start from {0}. */
typedef struct utw_notes {
    int n;
    utw_note note[UTW_NOTES_MAX];
} utw_notes;

/** Add a printf-style note; what does not fit is left out. */
void utw_notes_add(utw_notes *notes, int sign, const char *format, ...)
    __attribute__((format(printf, 3, 4)));

/** Set the notes in as many columns of equal width as fit, read down the columns. (x, y): top left
 * corner. `sign_at` (may be NULL) draws a sign centred at a place. Returns where they end below. */
double utw_flow_notes(utw_canvas *canvas, double x, double y, double width, const utw_notes *notes,
                      const utw_type *type, int draw,
                      void (*sign_at)(utw_canvas *, int sign, double x, double y, double size));

#endif
