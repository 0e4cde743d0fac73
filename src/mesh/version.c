/* SPDX-License-Identifier: GPL-3.0-or-later
 * Which mesher meshes. */
#include <gmshc.h>
#include <stdio.h>

#include "untwist.h"

void utw_mesher_version(char *text, size_t n)
{
    int failed = 0, ignored = 0;
    char *version = NULL;
    if (text == NULL || n == 0) return;
    /* the number in the header is that of the interface only; the library tells its own once
     * started */
    gmshInitialize(0, NULL, 0, &failed);
    if (!failed) {
        gmshOptionGetString("General.Version", &version, &failed);
        gmshFinalize(&ignored);
    }
    snprintf(text, n, "Gmsh %s", failed || version == NULL ? GMSH_API_VERSION : version);
    gmshFree(version);
}
