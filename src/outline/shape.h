/* SPDX-License-Identifier: GPL-3.0-or-later
 * Trade shapes: from named dimensions to a part. The registry, and what the families of shapes
 * share. */
#ifndef UTW_OUTLINE_SHAPE_H
#define UTW_OUTLINE_SHAPE_H

#include <math.h>

#include "outline/draft.h"
#include "outline/outline.h"

enum { UTW_SHAPE_DIMENSIONS = 12 }; /* no shape has more */

typedef struct utw_shape_case utw_shape_case;

/** One trade shape. Everything is borrowed from constant tables. */
typedef struct utw_shape {
    const char *name;    /* as written in files and on the command line */
    const char *meaning; /* what it is, in a few words */
    const char *origin;  /* where the origin of its coordinates lies */
    const char *drawing; /* a dimensioned sketch in text */
    int n_dimension;
    const utw_shape_dimension *dimension; /* [n_dimension] */
    /** Draw it: dimensions are in range one by one already; the builder checks them against one
     * another (utw_shape_need_*) and fills in the defaults that depend on them (utw_shape_default);
     * fillets between lines are checked when the draft is made into a part. */
    utw_status (*build)(utw_shape_case *given, utw_draft *draft, utw_error *err);
} utw_shape;

/** A shape with values. Angles as given, in degrees; slopes in per cent. */
struct utw_shape_case {
    const utw_shape *shape;
    double value[UTW_SHAPE_DIMENSIONS]; /* in the order of the table; NAN: not given and no fixed
                                           default */
    int given[UTW_SHAPE_DIMENSIONS];
};

/** The shapes of each file, in the order they are listed. */
extern const utw_shape utw_shape_rectangle, utw_shape_round, utw_shape_ellipse, utw_shape_polygon,
    utw_shape_trapezium;
extern const utw_shape utw_shape_tube, utw_shape_box, utw_shape_slit_tube, utw_shape_arc_strip;
extern const utw_shape utw_shape_angle, utw_shape_zed, utw_shape_cruciform, utw_shape_bulb;
extern const utw_shape utw_shape_channel, utw_shape_i, utw_shape_tee;
extern const utw_shape utw_shape_hat, utw_shape_formed_channel, utw_shape_formed_zed;
extern const utw_shape utw_shape_keyed_shaft, utw_shape_splined_shaft;

/** The shape of that name, or NULL. */
const utw_shape *utw_shape_find(const char *name);

/** Shape `index` of the list, or NULL when out of range. */
const utw_shape *utw_shape_at(int index);

/** The draft of a shape: loops with their fillets as a section file states them, placed.
 *  [in] name; keys[n], values[n], borrowed; placement, borrowed, may be NULL. [out] *draft, cleared
 * first and owned by the caller: utw_draft_clear(). *given (may be NULL) is the shape with the
 * values it was drawn from. UTW_E_SYNTAX: unknown shape, unknown, missing or repeated dimension.
 * UTW_E_OUTLINE: a value out of range or that does not fit. UTW_E_NOMEM. The message names shape,
 * dimension, value and limit. */
utw_status utw_shape_draft(const char *name, int n, const char *const *keys, const double *values,
                           const utw_placement *placement, utw_draft *draft, utw_shape_case *given,
                           utw_error *err);

/** The part of a shape (material -1): outline counter-clockwise, holes clockwise. [out] *part,
 * owned by the caller: utw_part_clear(). Statuses as utw_shape_draft(). */
utw_status utw_shape_part(const char *name, int n, const char *const *keys, const double *values,
                          const utw_placement *placement, utw_part *part, utw_error *err);

/** The values of a shape, each checked by itself. Statuses as utw_shape_draft(). */
utw_status utw_shape_collect(const utw_shape *shape, int n, const char *const *keys,
                             const double *values, utw_shape_case *given, utw_error *err);

/** Text for messages that grows as far as its buffer goes. */
typedef struct utw_words {
    char text[400];
    size_t n;
} utw_words;

void utw_words_add(utw_words *w, const char *before, const char *text);

/* ---- for the builders ---- */

/** Rows of the tables: a length that must be given, one that follows from others when it is not, a
 * radius. */
#define UTW_SHAPE_SIZE(key, meaning)                                                               \
    {                                                                                              \
        key, meaning, UTW_SHAPE_IN_LENGTH, 1, (double)NAN, "", 0, 1e9, 1                           \
    }
#define UTW_SHAPE_SIZE_OR(key, meaning, otherwise)                                                 \
    {                                                                                              \
        key, meaning, UTW_SHAPE_IN_LENGTH, 0, (double)NAN, otherwise, 0, 1e9, 1                    \
    }
#define UTW_SHAPE_RADIUS(key, meaning)                                                             \
    {                                                                                              \
        key, meaning, UTW_SHAPE_IN_LENGTH, 0, 0.0, "", 0, 1e9, 0                                   \
    }
#define UTW_SHAPE_ROWS(table) (int)(sizeof(table) / sizeof *(table)), table

/** Bit of dimension k in a list of dimensions. */
#define UTW_DIM(k) (1u << (k))

/** Value k must be less than (at most) `limit`, which follows from the dimensions in `with`.
 *  UTW_E_OUTLINE "channel: tw = 60 does not fit: less than 50 with b = 50". */
utw_status utw_shape_need_less(const utw_shape_case *given, int k, double limit, unsigned with,
                               utw_error *err);
utw_status utw_shape_need_at_most(const utw_shape_case *given, int k, double limit, unsigned with,
                                  utw_error *err);
utw_status utw_shape_need_more(const utw_shape_case *given, int k, double limit, unsigned with,
                               utw_error *err);
utw_status utw_shape_need_at_least(const utw_shape_case *given, int k, double limit, unsigned with,
                                   utw_error *err);

/** Value k was found to be more than `limit`. UTW_E_OUTLINE, always; the message as above, "at
 * most". */
utw_status utw_shape_refuse(const utw_shape_case *given, int k, double limit, unsigned with,
                            utw_error *err);

/** The slope of a tapered flange from dimension `percent` or dimension `degrees`, of which at most
 * one may be given. [out] *slope as rise over run; *which the dimension that stated it (percent
 * when neither did). */
utw_status utw_shape_slope(const utw_shape_case *given, int percent, int degrees, double *slope,
                           int *which, utw_error *err);

/** Value k, which becomes `otherwise` when it was not given and has no fixed default. */
double utw_shape_default(utw_shape_case *given, int k, double otherwise);

/** All dimensions that are given and not 0, except k: what a message about a fillet lists. */
unsigned utw_shape_others(const utw_shape_case *given, int k);

#endif
