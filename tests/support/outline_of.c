/* SPDX-License-Identifier: GPL-3.0-or-later
 * Outlines from JSON text in a test. */
#include "support/support.h"

utw_outline *utw_outline_of(const char *json)
{
    utw_error err;
    utw_outline *outline = NULL;
    assert_ok(utw_outline_parse(json, strlen(json), "test", &outline, &err));
    return outline;
}
