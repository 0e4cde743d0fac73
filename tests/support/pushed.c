/* SPDX-License-Identifier: GPL-3.0-or-later
 * A solved section with a push on a bar of it. */
#include "support/pushed.h"

#define MATERIAL                                                                                   \
    "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27, \"yield\": 250}}, " \
    "\"parts\": [{\"material\": \"m\", "

const char *const pushed_channel =
    MATERIAL "\"outline\": [[0,-50], [50,-50], [50,-41.5], {\"at\": [6,-41.5], \"round\": 8.5}, "
             "{\"at\": [6,41.5], \"round\": 8.5}, [50,41.5], [50,50], [0,50]]}]}";

const char *const pushed_blade =
    MATERIAL "\"outline\": [{\"at\": [0,0], \"bulge\": 0.25}, {\"at\": [120,0], \"bulge\": "
             "0.05}], \"holes\": [[[22,0.4], [38,0.4], [38,9], [22,7]], [[44,0], [66,0], [66,12], "
             "[44,11]]]}]}";

utw_push *pushed_by(const stressed *s, const utw_push_load *load)
{
    utw_error err;
    utw_push *push = NULL;
    assert_ok(utw_push_create(s->solution, s->stress, load, &push, &err));
    return push;
}

utw_push_load pushed_load(double length, double fx, double fy, double x, double y)
{
    utw_push_load load = UTW_PUSH_INIT;
    load.length = length;
    load.force[0] = fx, load.force[1] = fy;
    load.has_at = 1, load.at[0] = x, load.at[1] = y;
    return load;
}
