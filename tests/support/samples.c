/* SPDX-License-Identifier: GPL-3.0-or-later
 * The collection: the examples, and sections of no symmetry. */
#include "support/samples.h"

static const char *const examples[] = {"aerofoil-box", "bulb-flat",          "corner-bracket",
                                       "keyed-shaft",  "machined-channel",   "solid-cam",
                                       "t-slot-rail",  "two-chamber-mullion"};

static const struct {
    const char *name, *part;
} drawn[] = {
    {"sharp angle", "\"outline\":[[0,0],[57,4],[56,11],[13,9],[9,71],[1,70]]"},
    {"lug", "\"outline\":[[0,0],[40,-3],{\"at\":[40,31],\"arc\":[61,13]},{\"at\":[3,28],\"bezier\":"
            "[[30,22],[12,40]]}],"
            "\"holes\":[{\"circle\":[41,14,7.3]},[[6,6],{\"at\":[21,5],\"round\":2},{\"at\":[19,19]"
            ",\"round\":3},[7,17]]]"},
    {"blade", "\"outline\":[{\"at\":[98,7],\"through\":[[71,15],[44,17],[17,13],[4,6],[0,0],[5,-3],"
              "[20,-2],[47,3],[73,6]]}]"},
    {"perforated bar",
     "\"outline\":[[0,0],[80,5],{\"at\":[76,33],\"round\":9},[-2,30]],"
     "\"holes\":[{\"circle\":[14,14,8]},{\"ellipse\":[37,18,10,5,30]},{\"circle\":[61,17,7]}]"},
    {"notched disc",
     "\"outline\":[[3,29.8],{\"at\":[-30,0],\"arc\":[-20,22]},{\"at\":[30,0],\"arc\":[0,-30]},"
     "{\"at\":[9,28.6],\"arc\":[22,20]},[8,11],[4,10]]"},
};

enum { EXAMPLES = sizeof examples / sizeof *examples, DRAWN = sizeof drawn / sizeof *drawn };

utw_outline *sample_outline(int i, const char **name)
{
    if (i < 0 || i >= EXAMPLES + DRAWN) return NULL;
    if (i >= EXAMPLES) {
        *name = drawn[i - EXAMPLES].name;
        return section_outline(0.3, "%s", drawn[i - EXAMPLES].part);
    }
    char path[1024];
    utw_error err;
    utw_outline *outline = NULL;
    *name = examples[i];
    snprintf(path, sizeof path, "%s/examples/%s.json", UTW_SOURCE_DIR, examples[i]);
    assert_ok(utw_outline_read(path, &outline, &err));
    return outline;
}
