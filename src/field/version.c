/* SPDX-License-Identifier: GPL-3.0-or-later
 * Which library factorises. */
#include <cholmod.h>
#include <stdio.h>

#include "untwist.h"

void utw_solver_version(char *text, size_t n)
{
    int version[3] = {0, 0, 0};
    if (text == NULL || n == 0) return;
    cholmod_version(version);
    snprintf(text, n, "CHOLMOD %d.%d.%d", version[0], version[1], version[2]);
}
