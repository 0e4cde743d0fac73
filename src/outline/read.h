/* SPDX-License-Identifier: GPL-3.0-or-later
 * Inside the reader of section files: what its files share. Every function returns UTW_OK or fills
 * r->err. */
#ifndef UTW_OUTLINE_READ_H
#define UTW_OUTLINE_READ_H

#include "base/status.h"
#include "outline/json.h"
#include "outline/let.h"
#include "outline/outline.h"

#define UTW_LONGEST_NAME 200 /* bytes of a name */
#define UTW_MOST_MATERIALS                                                                         \
    1000 /* more is a mistake, and would make the search for duplicates slow */
#define UTW_MOST_DIMENSIONS 1000
#define UTW_MOST_LOADS      2000
#define UTW_MOST_PARTS      2000
#define UTW_MOST_HOLES      2000   /* of one part */
#define UTW_MOST_VERTICES   100000 /* of one loop */

/** The state of a reading. The place is put before a message once, when the reading ends. */
typedef struct utw_reader {
    utw_error *err; /* borrowed, never NULL */
    utw_outline *outline;
    const char *path; /* of the section file, borrowed: files it names lie beside it */
    utw_let *let; /* named dimensions, perhaps none; for every number given as an expression */
    int n_set;    /* dimensions set from outside */
    const char *const *set; /* [n_set], borrowed: "t=5" */
    int part, loop, vertex; /* being read, 0-based; -1: none */
    char subject[96];       /* being read when it is no part, such as `material "6082"`; else "" */
} utw_reader;

/** Reads `value`, called `what` in messages, into *target. */
typedef utw_status (*utw_value_reader)(utw_reader *r, const utw_json *value, const char *what,
                                       void *target);

/** A key of an object: its name, how it is read, where in the target it goes. */
typedef struct utw_key {
    const char *name;
    utw_value_reader read;
    size_t offset;
} utw_key;

/** Read an object, called `what` when it is none, whose keys are among key[n_key] (n_key <= 32).
 * Unknown and repeated keys are UTW_E_SYNTAX. [out] *given (may be NULL): bit k is set when key[k]
 * was there. */
utw_status utw_read_object(utw_reader *r, const utw_json *object, const char *what,
                           const utw_key *key, int n_key, void *target, unsigned *given);

/** A finite number, or an expression for one in a string: double *target. Every number of a section
 * file is read here. */
utw_status utw_read_number(utw_reader *r, const utw_json *value, const char *what, void *target);

/** An array of least..most numbers. [in] form, such as "[x, y]", for messages; [out] number[most],
 * *n. */
utw_status utw_read_numbers(utw_reader *r, const utw_json *value, const char *what,
                            const char *form, int least, int most, double *number, int *n);

/** A point [x, y]: double target[2]. */
utw_status utw_read_point(utw_reader *r, const utw_json *value, const char *what, void *target);

/** Text without control characters, at most UTW_LONGEST_NAME bytes: char **target, returned owned
 * (a value there before is freed). */
utw_status utw_read_text(utw_reader *r, const utw_json *value, const char *what, void *target);

/** Check that a value is an array (object) and, for an array, count it: at most `most`. */
utw_status utw_read_array(utw_reader *r, const utw_json *value, const char *what, int most, int *n);

/** "let": fills r->let, sets r->set, resolves, and copies the values to the outline. target:
 * utw_outline. */
utw_status utw_read_let(utw_reader *r, const utw_json *value, const char *what, void *target);

/** "units": fills outline->units, length_unit, force_unit. target: utw_outline. */
utw_status utw_read_units(utw_reader *r, const utw_json *value, const char *what, void *target);

/** "materials", "parts", "loads". target: utw_outline. */
utw_status utw_read_materials(utw_reader *r, const utw_json *value, const char *what, void *target);
utw_status utw_read_parts(utw_reader *r, const utw_json *value, const char *what, void *target);
/** "shape" in place of "parts": makes part 0. target: utw_outline, without parts. */
utw_status utw_read_shape(utw_reader *r, const utw_json *value, const char *what, void *target);
/** "midline" in place of "parts": likewise, and keeps the midline. */
utw_status utw_read_midline(utw_reader *r, const utw_json *value, const char *what, void *target);
utw_status utw_read_loads(utw_reader *r, const utw_json *value, const char *what, void *target);

/** One loop (array of vertices, circle or ellipse). target: utw_loop. */
utw_status utw_read_loop(utw_reader *r, const utw_json *value, const char *what, void *target);

/** "shape" in place of "outline" and "holes". target: utw_part, whose loops are replaced. */
utw_status utw_read_part_shape(utw_reader *r, const utw_json *value, const char *what,
                               void *target);

/** "aerofoil" of a shape. [out] *part, owned by the caller: utw_part_clear(). */
utw_status utw_read_aerofoil(utw_reader *r, const utw_json *value, utw_part *part);

/** A material by its name: int *target is its index. UTW_E_MATERIAL when it is not defined. */
utw_status utw_read_material_name(utw_reader *r, const utw_json *value, const char *what,
                                  void *target);

/** The whole content of a file ("-" is standard input). [out] *text, returned owned: utw_free();
 * *n. UTW_E_FILE when it cannot be read or holds more than 64 MiB, UTW_E_NOMEM. */
utw_status utw_read_file(const char *path, char **text, size_t *n, utw_error *err);

#endif
