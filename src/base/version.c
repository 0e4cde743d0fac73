/* SPDX-License-Identifier: GPL-3.0-or-later
 * The version of the library. */
#include "untwist.h"
#include "version.h"

const char *utw_version(void)
{
    return UTW_VERSION;
}
