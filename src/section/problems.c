/* SPDX-License-Identifier: GPL-3.0-or-later
 * Loads and particular fluxes of torsion and flexure. */
#include "section/problems.h"

#include <string.h>

enum { ONE, X, Y, XX, XY, YY };

static void load_is_flux(utw_pair *pair)
{
    memcpy(pair->g, pair->P, sizeof pair->g);
}

void utw_problems(utw_pair *pair)
{
    memset(pair, 0, UTW_N_PAIR * sizeof *pair);

    pair[UTW_TORSION].P[0][Y] = 1;
    pair[UTW_TORSION].P[1][X] = -1;
    load_is_flux(&pair[UTW_TORSION]);

    pair[UTW_SHEAR_X].s[X] = 1;
    pair[UTW_SHEAR_X].P[0][XX] = -0.5; /* -div P = x */
    pair[UTW_SHEAR_X].balanced = 1;

    pair[UTW_SHEAR_Y].s[Y] = 1;
    pair[UTW_SHEAR_Y].P[1][YY] = -0.5;
    pair[UTW_SHEAR_Y].balanced = 1;

    pair[UTW_ANTI_X].P[0][XX] = 0.5;
    pair[UTW_ANTI_X].P[0][YY] = -0.5;
    pair[UTW_ANTI_X].P[1][XY] = 1;
    load_is_flux(&pair[UTW_ANTI_X]);

    pair[UTW_ANTI_Y].P[0][XY] = 1;
    pair[UTW_ANTI_Y].P[1][YY] = 0.5;
    pair[UTW_ANTI_Y].P[1][XX] = -0.5;
    load_is_flux(&pair[UTW_ANTI_Y]);
}
